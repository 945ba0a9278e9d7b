/* Open heater, deaerator: a lying cylinder with a dome on top, its water level marked.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include <math.h>
#include "draw/symbols/symbol-private.h"

#define TANK_TOP 0.6
#define TANK_RADIUS 1.2
#define DOME_HALF_WIDTH 1.1

static void
draw (const HlPen *pen)
{
  static const double level[][2] = { { -2.35, 1.45 }, { 2.35, 1.45 } };
  hl_pen_box (pen, -DOME_HALF_WIDTH, -3.0, 2 * DOME_HALF_WIDTH, 4.2, 0.55);
  hl_pen_body (pen);
  hl_pen_box (pen, -3.0, TANK_TOP, 6.0, 2 * TANK_RADIUS, TANK_RADIUS);
  hl_pen_body (pen);
  hl_pen_path (pen, level, 2);
  hl_pen_stroke (pen, &pen->theme->ink, 0.5);
  /* Spray and trays. */
  for (int i = 0; i < 3; i++)
    {
      cairo_move_to (pen->cr, -0.55 * U, (-1.75 + 0.65 * i) * U);
      cairo_line_to (pen->cr, 0.55 * U, (-1.75 + 0.65 * i) * U);
    }
  hl_pen_stroke (pen, &pen->theme->ink, 0.5);
}

/* Ports at the side stand beside the dome, or beside the round end of the tank. */
static double
lead (const HlComponent *component, double x, double y, HlSide side, double half_width)
{
  double from_axis = y / U - (TANK_TOP + TANK_RADIUS);
  (void) component; (void) x;
  if (side == HL_SIDE_UP || side == HL_SIDE_DOWN)
    return 0.0;
  if (fabs (from_axis) >= TANK_RADIUS)
    return half_width - DOME_HALF_WIDTH * U;
  return (TANK_RADIUS - sqrt (TANK_RADIUS * TANK_RADIUS - from_axis * from_axis)) * U;
}

const HlSymbol hl_symbol_open_heater = { "open_heater", draw, lead };
