/* Solar field: troughs along a pipe, the sun above.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include <math.h>
#include "draw/symbols/symbol-private.h"

static void
draw (const HlPen *pen)
{
  static const double pipe[][2] = { { -3.0, 0.0 }, { 3.0, 0.0 } };
  cairo_t *cr = pen->cr;
  hl_pen_box (pen, -2.7, -1.8, 5.4, 3.6, 0.25);
  hl_pen_body (pen);
  hl_pen_path (pen, pipe, 2);
  hl_pen_stroke (pen, &pen->theme->ink, 0.85);
  for (int k = -1; k <= 1; k++)
    {
      cairo_move_to (cr, (1.7 * k - 0.65) * U, 0.15 * U);
      cairo_curve_to (cr, (1.7 * k - 0.5) * U, 1.1 * U, (1.7 * k + 0.5) * U, 1.1 * U, (1.7 * k + 0.65) * U, 0.15 * U);
      hl_pen_stroke (pen, &pen->theme->ink, 0.7);
    }
  hl_pen_circle (pen, 0.0, -1.1, 0.32);
  hl_pen_stroke (pen, &pen->theme->steam, 0.8);
  for (int k = 0; k < 8; k++)
    {
      double x = cos (k * G_PI_4), y = sin (k * G_PI_4);
      const double ray[][2] = { { 0.45 * x, -1.1 + 0.45 * y }, { 0.62 * x, -1.1 + 0.62 * y } };
      hl_pen_path (pen, ray, 2);
      hl_pen_stroke (pen, &pen->theme->steam, 0.5);
    }
}

const HlSymbol hl_symbol_solar_field = { "solar_field", draw, NULL };
