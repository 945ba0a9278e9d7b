/* Closed heater: box crossed by the feed as a zigzag, the drain's zone divided off below.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "draw/symbols/symbol-private.h"

#define HALF_WIDTH 1.8

static void
draw (const HlPen *pen)
{
  static const double zigzag[][2] = {
    { 1.8, 0.0 }, { 1.15, 0.0 }, { 0.75, -1.1 }, { 0.25, 0.75 }, { -0.25, -1.1 }, { -0.75, 0.75 }, { -1.15, 0.0 }, { -1.8, 0.0 } };
  static const double divider[][2] = { { -1.8, 1.2 }, { 1.05, 1.2 } };
  hl_pen_box (pen, -HALF_WIDTH, -2.0, 2 * HALF_WIDTH, 4.0, 0.25);
  hl_pen_body (pen);
  hl_pen_path (pen, zigzag, G_N_ELEMENTS (zigzag));
  hl_pen_stroke (pen, &pen->theme->ink, 0.8);
  hl_pen_path (pen, divider, G_N_ELEMENTS (divider));
  hl_pen_stroke (pen, &pen->theme->ink, 0.5);
}

static double
lead (const HlComponent *component, double x, double y, HlSide side, double half_width)
{
  (void) component; (void) x; (void) y;
  return side == HL_SIDE_LEFT || side == HL_SIDE_RIGHT ? half_width - HALF_WIDTH * U : 0.0;
}

const HlSymbol hl_symbol_closed_heater = { "closed_heater", draw, lead };
