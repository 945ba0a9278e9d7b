/* Cooling tower: a waisted shell over its basin, water falling inside.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "draw/symbols/symbol-private.h"

#define TOP 1.6
#define WAIST 1.25
#define FOOT 2.5

static void
draw (const HlPen *pen)
{
  static const double pipe[][2] = { { -3.0, 0.0 }, { 1.1, 0.0 } };
  cairo_t *cr = pen->cr;
  cairo_move_to (cr, -TOP * U, -3.0 * U);
  cairo_line_to (cr, TOP * U, -3.0 * U);
  cairo_curve_to (cr, WAIST * 0.8 * U, -1.0 * U, 1.6 * U, 1.0 * U, FOOT * U, 3.0 * U);
  cairo_line_to (cr, -FOOT * U, 3.0 * U);
  cairo_curve_to (cr, -1.6 * U, 1.0 * U, -WAIST * 0.8 * U, -1.0 * U, -TOP * U, -3.0 * U);
  cairo_close_path (cr);
  hl_pen_body (pen);
  hl_pen_path (pen, pipe, 2);
  hl_pen_stroke (pen, &pen->theme->ink, 0.8);
  for (int k = -1; k <= 1; k++)
    {
      cairo_move_to (cr, k * 0.8 * U, 0.35 * U);
      cairo_line_to (cr, k * 0.8 * U, 1.75 * U);
    }
  cairo_set_dash (cr, (const double[]) { 2.0, 3.0 }, 2, 0.0);
  hl_pen_stroke (pen, &pen->theme->water, 0.8);
  cairo_set_dash (cr, NULL, 0, 0.0);
  cairo_move_to (cr, -2.2 * U, 2.2 * U);
  cairo_line_to (cr, 2.2 * U, 2.2 * U);
  hl_pen_stroke (pen, &pen->theme->ink, 0.5);
}

const HlSymbol hl_symbol_cooling_tower = { "cooling_tower", draw, NULL };
