/* District heater: circle with the network's water in a hairpin.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include <math.h>
#include "draw/symbols/symbol-private.h"

#define RADIUS 2.0

static void
draw (const HlPen *pen)
{
  static const double hairpin[][2] = { { 1.732, 1.0 }, { -0.3, 1.0 }, { -0.9, 0.6 }, { -0.3, 0.2 }, { -0.9, -0.2 }, { -0.3, -0.6 }, { -0.3, -1.0 }, { 1.732, -1.0 } };
  hl_pen_circle (pen, 0.0, 0.0, RADIUS);
  hl_pen_body (pen);
  hl_pen_path (pen, hairpin, G_N_ELEMENTS (hairpin));
  hl_pen_stroke (pen, &pen->theme->ink, 0.8);
  hl_pen_arrow_head (pen, 1.3, -1.0, 1.0, 0.0, 0.6, &pen->theme->steam);
}

static double
lead (const HlComponent *component, double x, double y, HlSide side, double half_width)
{
  double off = (side == HL_SIDE_LEFT || side == HL_SIDE_RIGHT ? y : x) / U;
  (void) component;
  return half_width - sqrt (MAX (RADIUS * RADIUS - off * off, 0.0)) * U;
}

const HlSymbol hl_symbol_district_heater = { "district_heater", draw, lead };
