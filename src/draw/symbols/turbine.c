/* Turbine section and feed pump turbine: a trapezium that widens with the flow, extractions at its long side.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "draw/symbols/symbol-private.h"

#define NARROW 1.0

/* As wide as its box is high. */
static void
draw (const HlPen *pen)
{
  double w = pen->half_width / U, wide = pen->half_height / U;
  const double outline[][2] = { { -w, -NARROW }, { w, -wide }, { w, wide }, { -w, NARROW } };
  hl_pen_path (pen, outline, G_N_ELEMENTS (outline));
  cairo_close_path (pen->cr);
  hl_pen_body (pen);
}

/* The wheel of the control stage. */
static void
draw_stage (const HlPen *pen)
{
  static const double wheel[][2] = { { 0.0, -1.5 }, { 0.0, 1.5 } };
  draw (pen);
  hl_pen_path (pen, wheel, 2);
  hl_pen_stroke (pen, &pen->theme->ink, 0.7);
}

/* Extractions leave below the box; the slanted side lies above their ports. */
static double
lead (const HlComponent *component, double x, double y, HlSide side, double half_width)
{
  double wide = component->kind->half_height, edge = (NARROW + (wide - NARROW) * (x + half_width) / (2.0 * half_width)) * U;
  if (side == HL_SIDE_DOWN)
    return y - edge;
  return side == HL_SIDE_UP ? -y - edge : 0.0;
}

const HlSymbol hl_symbol_turbine = { "turbine", draw, lead };
const HlSymbol hl_symbol_control_stage = { "control_stage", draw_stage, lead };
const HlSymbol hl_symbol_feed_pump_turbine = { "feed_pump_turbine", draw, lead };
