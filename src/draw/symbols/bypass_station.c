/* Bypass and letdown station: a throttle valve and the spray behind it.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "draw/symbols/symbol-private.h"

static void
draw (const HlPen *pen)
{
  static const double left[][2] = { { -2.7, -0.8 }, { -1.5, 0.0 }, { -2.7, 0.8 } }, right[][2] = { { -0.3, -0.8 }, { -1.5, 0.0 }, { -0.3, 0.8 } };
  hl_pen_box (pen, -0.3, -0.8, 3.0, 1.6, 0.2);
  hl_pen_body (pen);
  hl_pen_path (pen, left, 3);
  cairo_close_path (pen->cr);
  hl_pen_body (pen);
  hl_pen_path (pen, right, 3);
  cairo_close_path (pen->cr);
  hl_pen_body (pen);
  for (int k = -1; k <= 1; k++)
    {
      cairo_move_to (pen->cr, 1.0 * U, 0.7 * U);
      cairo_line_to (pen->cr, (1.0 + k * 0.6) * U, -0.45 * U);
    }
  hl_pen_stroke (pen, &pen->theme->water, 0.7);
}

static double
lead (const HlComponent *component, double x, double y, HlSide side, double half_width)
{
  (void) component; (void) x; (void) y; (void) half_width;
  return side == HL_SIDE_DOWN ? 0.2 * U : 0.3 * U;
}

const HlSymbol hl_symbol_bypass_station = { "bypass_station", draw, lead };
