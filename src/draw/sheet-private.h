/* The parts of a sheet, for the files that draw them.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#pragma once
#include "draw/sheet-paper.h"
G_BEGIN_DECLS

#define HL_MILLIMETRE    (96.0 / 25.4)
#define HL_STRIP_WIDTH   142.0      /* in sizes of the text */
#define HL_STRIP_HEIGHT  15.2

typedef struct {
  const HlTheme       *theme;
  const HlPlant       *plant;
  const HlSolution    *solution;    /* NULL: drawing without figures */
  const HlLayout      *layout;
  const HlSheetFields *fields;
  double               text;        /* size in pixels */
  const char          *paper;
  double               scale;       /* of the drawing */
} HlStrip;
void hl_draw_strip (cairo_t *cr, const HlStrip *strip, const HlBox *box);
/* One line that ends with dots where it is longer than @width. */
void hl_text_show_within (cairo_t *cr, const HlTheme *theme, const char *text, double x, double y, double width, int align, double size, gboolean is_bold);
/* A paragraph with its top at @y; returns its height. */
double hl_text_show_wrapped (cairo_t *cr, const HlTheme *theme, const char *text, double x, double y, double width, double size, gboolean is_bold);
G_END_DECLS
