/* Exchanger and recuperator: one medium straight through, the other crossing it as a zigzag.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include <math.h>
#include "draw/symbols/symbol-private.h"

#define RADIUS 1.9
#define HALF_WIDTH 1.8

static void
draw_exchanger (const HlPen *pen)
{
  static const double zigzag[][2] = { { 1.9, 0.0 }, { 0.95, 0.0 }, { 0.45, -0.9 }, { -0.45, 0.9 }, { -0.95, 0.0 }, { -1.9, 0.0 } };
  hl_pen_circle (pen, 0.0, 0.0, RADIUS);
  hl_pen_body (pen);
  hl_pen_path (pen, zigzag, G_N_ELEMENTS (zigzag));
  hl_pen_stroke (pen, &pen->theme->ink, 0.8);
}

static double
exchanger_lead (const HlComponent *component, double x, double y, HlSide side, double half_width)
{
  (void) component; (void) x; (void) y; (void) side;
  return half_width - RADIUS * U;
}

/* A coil each way: warmth that the cycle gives back to itself. */
static void
draw_recuperator (const HlPen *pen)
{
  static const double across[][2] = { { 1.8, 0.0 }, { 1.2, 0.0 }, { 0.75, -0.6 }, { 0.25, 0.6 }, { -0.25, -0.6 }, { -0.75, 0.6 }, { -1.2, 0.0 }, { -1.8, 0.0 } };
  static const double upper[][2] = { { 0.0, -2.0 }, { 0.0, -1.5 }, { -1.3, -1.5 }, { -1.3, -1.0 } };
  static const double lower[][2] = { { 1.3, 1.0 }, { 1.3, 1.5 }, { 0.0, 1.5 }, { 0.0, 2.0 } };
  hl_pen_box (pen, -HALF_WIDTH, -2.0, 2 * HALF_WIDTH, 4.0, 0.25);
  hl_pen_body (pen);
  hl_pen_path (pen, across, G_N_ELEMENTS (across));
  hl_pen_stroke (pen, &pen->theme->ink, 0.8);
  hl_pen_path (pen, upper, G_N_ELEMENTS (upper));
  hl_pen_stroke (pen, &pen->theme->ink, 0.6);
  hl_pen_path (pen, lower, G_N_ELEMENTS (lower));
  hl_pen_stroke (pen, &pen->theme->ink, 0.6);
  hl_pen_arrow_head (pen, -1.3, -0.6, 0.0, 1.0, 0.5, &pen->theme->steam);
}

static double
recuperator_lead (const HlComponent *component, double x, double y, HlSide side, double half_width)
{
  (void) component; (void) x; (void) y;
  return side == HL_SIDE_LEFT || side == HL_SIDE_RIGHT ? half_width - HALF_WIDTH * U : 0.0;
}

const HlSymbol hl_symbol_exchanger = { "exchanger", draw_exchanger, exchanger_lead };
const HlSymbol hl_symbol_recuperator = { "recuperator", draw_recuperator, recuperator_lead };
