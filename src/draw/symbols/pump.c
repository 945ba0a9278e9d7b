/* Pump: circle with a triangle pointing to the outlet.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "draw/symbols/symbol-private.h"

#define RADIUS 1.5

static void
draw (const HlPen *pen)
{
  static const double triangle[][2] = { { -0.75, -1.3 }, { 1.5, 0.0 }, { -0.75, 1.3 } };
  hl_pen_circle (pen, 0.0, 0.0, RADIUS);
  hl_pen_body (pen);
  hl_pen_path (pen, triangle, G_N_ELEMENTS (triangle));
  cairo_close_path (pen->cr);
  hl_pen_stroke (pen, &pen->theme->ink, 0.85);
}

static double
lead (const HlComponent *component, double x, double y, HlSide side, double half_width)
{
  (void) component; (void) x; (void) y; (void) side;
  return half_width - RADIUS * U;
}

const HlSymbol hl_symbol_pump = { "pump", draw, lead };
const HlSymbol hl_symbol_drain_pump = { "drain_pump", draw, lead };
