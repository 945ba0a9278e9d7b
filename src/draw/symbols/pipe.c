/* Pipe: a length between two flanges.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "draw/symbols/symbol-private.h"

#define HALF_LENGTH 1.6

static void
draw (const HlPen *pen)
{
  hl_pen_box (pen, -HALF_LENGTH, -0.42, 2 * HALF_LENGTH, 0.84, 0.0);
  hl_pen_body (pen);
  for (int side = -1; side <= 1; side += 2)
    {
      cairo_move_to (pen->cr, side * HALF_LENGTH * U, -0.8 * U);
      cairo_line_to (pen->cr, side * HALF_LENGTH * U, 0.8 * U);
    }
  hl_pen_stroke (pen, &pen->theme->ink, 1.0);
}

static double
lead (const HlComponent *component, double x, double y, HlSide side, double half_width)
{
  (void) component; (void) x; (void) y; (void) side;
  return half_width - HALF_LENGTH * U;
}

const HlSymbol hl_symbol_pipe = { "pipe", draw, lead };
