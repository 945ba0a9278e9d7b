/* Air-cooled condenser: finned roof over a fan.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "draw/symbols/symbol-private.h"

static void
draw (const HlPen *pen)
{
  static const double roof[][2] = { { 0.0, -2.2 }, { 3.0, 0.0 }, { 3.0, 0.5 }, { -3.0, 0.5 }, { -3.0, 0.0 } };
  static const double stem[][2] = { { 0.0, -3.0 }, { 0.0, -2.2 } };
  hl_pen_path (pen, roof, G_N_ELEMENTS (roof));
  cairo_close_path (pen->cr);
  hl_pen_body (pen);
  hl_pen_path (pen, stem, 2);
  hl_pen_stroke (pen, &pen->theme->ink, 1.0);
  /* Fins along both slopes. */
  for (int k = 1; k <= 4; k++)
    for (int side = -1; side <= 1; side += 2)
      {
        double x = side * 0.6 * k, y = -2.2 + 2.2 * 0.2 * k;
        cairo_move_to (pen->cr, x * U, y * U);
        cairo_line_to (pen->cr, x * U, (y + 0.75) * U);
      }
  hl_pen_stroke (pen, &pen->theme->ink, 0.5);
  /* The fan: hub, two blades, air rising. */
  for (int side = -1; side <= 1; side += 2)
    {
      cairo_move_to (pen->cr, 0.0, 1.8 * U);
      cairo_curve_to (pen->cr, side * 0.4 * U, 1.3 * U, side * 1.2 * U, 1.3 * U, side * 1.5 * U, 1.8 * U);
      cairo_curve_to (pen->cr, side * 1.2 * U, 2.2 * U, side * 0.4 * U, 2.2 * U, 0.0, 1.8 * U);
      cairo_close_path (pen->cr);
      hl_pen_body (pen);
    }
  for (int side = -1; side <= 1; side += 2)
    {
      cairo_move_to (pen->cr, side * 2.2 * U, 2.6 * U);
      cairo_line_to (pen->cr, side * 2.2 * U, 1.6 * U);
      hl_pen_stroke (pen, &pen->theme->quiet, 0.7);
      hl_pen_arrow_head (pen, side * 2.2, 1.0, 0.0, -1.0, 0.6, &pen->theme->quiet);
    }
}

const HlSymbol hl_symbol_air_condenser = { "air_condenser", draw, NULL };
