/* What differs between two plants, as marks on the drawing: added, changed, removed.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#pragma once
#include "draw/theme.h"
#include "plant/change.h"
G_BEGIN_DECLS

typedef enum { HL_MARK_NONE, HL_MARK_ADDED, HL_MARK_CHANGED, HL_MARK_REMOVED, HL_N_MARKS } HlMark;
const char *hl_mark_name (HlMark mark);                      /* translated: "added"; "" for none */

typedef struct _HlMarks HlMarks;
/* What leads from @reference to @plant.  Places in the drawing and names are no difference here. */
HlMarks        *hl_marks_new   (const HlPlant *reference, const HlPlant *plant);
void            hl_marks_free  (HlMarks *marks);
HlMark          hl_marks_of    (const HlMarks *marks, const char *id);       /* of a component or stream of @plant */
guint           hl_marks_count (const HlMarks *marks, HlMark mark);          /* components and streams with this mark */
/* Components and streams that only the reference has, by their index there: (element-type guint). */
const GArray   *hl_marks_removed_components (const HlMarks *marks);
const GArray   *hl_marks_removed_streams    (const HlMarks *marks);
G_DEFINE_AUTOPTR_CLEANUP_FUNC (HlMarks, hl_marks_free)

/* A round badge with a sign of its own beside its colour: plus, triangle, minus. */
void            hl_draw_mark   (cairo_t *cr, const HlTheme *theme, HlMark mark, double x, double y, double radius);
const HlColour *hl_mark_colour (const HlTheme *theme, HlMark mark);
G_END_DECLS
