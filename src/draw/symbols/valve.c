/* Throttle valve: two triangles tip to tip.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "draw/symbols/symbol-private.h"

#define HALF_LENGTH 1.5

static void
draw (const HlPen *pen)
{
  static const double outline[][2] = { { -HALF_LENGTH, -0.85 }, { HALF_LENGTH, 0.85 }, { HALF_LENGTH, -0.85 }, { -HALF_LENGTH, 0.85 } };
  hl_pen_path (pen, outline, G_N_ELEMENTS (outline));
  cairo_close_path (pen->cr);
  hl_pen_body (pen);
}

static double
lead (const HlComponent *component, double x, double y, HlSide side, double half_width)
{
  (void) component; (void) x; (void) y; (void) side;
  return half_width - HALF_LENGTH * U;
}

const HlSymbol hl_symbol_valve = { "valve", draw, lead };
