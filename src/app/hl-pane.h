/* What the panes share: headings, cards and the marks of findings.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#pragma once
#include <gtk/gtk.h>
#include "app/hl-session.h"
#include "draw/theme.h"
G_BEGIN_DECLS

HlUnitSet  hl_pane_units   (HlSession *session);

GtkWidget *hl_pane_label   (const char *text, const char *css_class);   /* left-aligned; @css_class nullable */
GtkWidget *hl_pane_heading (const char *text);                          /* small, spaced, quiet */
void       hl_pane_set_accessible (GtkWidget *widget, const char *label, const char *description);   /* description nullable */
void       hl_pane_clear   (GtkWidget *box);                            /* unparents all children of a GtkBox */

/* The mark of a grade: a shape of its own and a colour, so that colour is never the only cue. */
#define HL_TYPE_GRADE_MARK (hl_grade_mark_get_type ())
G_DECLARE_FINAL_TYPE (HlGradeMark, hl_grade_mark, HL, GRADE_MARK, GtkWidget)
typedef enum { HL_SHAPE_GOOD, HL_SHAPE_HINT, HL_SHAPE_CAUTION, HL_SHAPE_WARNING, HL_SHAPE_ERROR } HlGradeShape;
GtkWidget *hl_grade_mark_new       (HlGradeShape shape);
void       hl_grade_mark_set_shape (HlGradeMark *self, HlGradeShape shape);
HlGradeShape hl_grade_mark_of (HlGrade grade);
G_END_DECLS
