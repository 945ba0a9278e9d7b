/* The heat balance drawing on a sheet of paper: frame, legends, performance, title block.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#pragma once
#include "draw/export.h"
#include "draw/canvas-picture.h"
#include "draw/variants.h"
G_BEGIN_DECLS

typedef enum { HL_PAPER_A4, HL_PAPER_A3, HL_PAPER_A2, HL_PAPER_A1, HL_PAPER_LETTER, HL_PAPER_TABLOID, HL_N_PAPERS } HlPaper;
const char *hl_paper_name    (HlPaper paper);                                        /* "A3", "Letter" */
gboolean    hl_paper_from_id (const char *id, HlPaper *paper, GError **error);       /* upper or lower case; says which there are */
void        hl_paper_size    (HlPaper paper, double *width, double *height);         /* landscape, pixels at 96 dpi */

/* What only the person who hands it over knows; NULL or "" leaves the field open.  No date: the same plant gives the same bytes. */
typedef struct {
  const char *variant, *case_name, *date, *revision, *drawn, *checked, *approved;
  HlComparison *comparison;      /* variants side by side, for the report; NULL: none */
} HlSheetFields;
/* The fields by word: "date"; NULL past the last. */
const char  *hl_sheet_field_id (guint n);
const char **hl_sheet_field    (HlSheetFields *fields, const char *id);              /* NULL: there is no such field */

/* @scale of the drawing, 0 as large as fits. */
void    hl_draw_paper_sheet (cairo_t *cr, const HlTheme *theme, const HlPlant *plant, const HlSolution *solution, HlPaper paper,
                             const HlSheetFields *fields, double scale);
/* FALSE with the reason where the drawing is larger than the sheet's field at this scale. */
GBytes *hl_export_sheet     (const HlSolution *solution, HlPaper paper, const HlSheetFields *fields, double scale, HlFormat format, GError **error);
G_END_DECLS
