/* Gland seal: a length of pipe with the teeth of a labyrinth.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "draw/symbols/symbol-private.h"

static void
draw (const HlPen *pen)
{
  hl_pen_box (pen, -1.7, -0.8, 3.4, 1.6, 0.15);
  hl_pen_body (pen);
  for (int k = -2; k <= 2; k++)
    {
      cairo_move_to (pen->cr, k * 0.55 * U, 0.8 * U);
      cairo_line_to (pen->cr, k * 0.55 * U, (k % 2 == 0 ? -0.1 : 0.2) * U);
    }
  cairo_move_to (pen->cr, -1.7 * U, -0.35 * U);
  cairo_line_to (pen->cr, 1.7 * U, -0.35 * U);
  hl_pen_stroke (pen, &pen->theme->ink, 0.7);
}

static double
lead (const HlComponent *component, double x, double y, HlSide side, double half_width)
{
  (void) component; (void) x; (void) y;
  return side == HL_SIDE_LEFT || side == HL_SIDE_RIGHT ? half_width - 1.7 * U : 0.2 * U;
}

const HlSymbol hl_symbol_gland_seal = { "gland_seal", draw, lead };
