/* Header: a long pipe closed at both ends.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "draw/symbols/symbol-private.h"

#define HALF 0.45

static void
draw (const HlPen *pen)
{
  hl_pen_box (pen, -6.0, -HALF, 12.0, 2.0 * HALF, HALF);
  hl_pen_body (pen);
}

static double
lead (const HlComponent *component, double x, double y, HlSide side, double half_width)
{
  (void) component; (void) x; (void) y; (void) half_width;
  return side == HL_SIDE_UP || side == HL_SIDE_DOWN ? (1.0 - HALF) * U : 0.0;
}

const HlSymbol hl_symbol_header = { "header", draw, lead };
