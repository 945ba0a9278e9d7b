/* Desuperheater: a length of pipe with a spray.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "draw/symbols/symbol-private.h"

static void
draw (const HlPen *pen)
{
  hl_pen_box (pen, -1.7, -0.8, 3.4, 1.6, 0.2);
  hl_pen_body (pen);
  for (int k = -1; k <= 1; k++)
    {
      cairo_move_to (pen->cr, 0.0, 0.7 * U);
      cairo_line_to (pen->cr, k * 0.6 * U, -0.45 * U);
    }
  hl_pen_stroke (pen, &pen->theme->water, 0.7);
}

static double
lead (const HlComponent *component, double x, double y, HlSide side, double half_width)
{
  (void) component; (void) x; (void) y;
  return side == HL_SIDE_LEFT || side == HL_SIDE_RIGHT ? half_width - 1.7 * U : 0.2 * U;
}

const HlSymbol hl_symbol_desuperheater = { "desuperheater", draw, lead };
