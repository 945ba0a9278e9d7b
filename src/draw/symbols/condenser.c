/* Condenser: circle crossed by the cooling water as a zigzag, the condensate's level below.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include <math.h>
#include "draw/symbols/symbol-private.h"

#define RADIUS 1.9

static void
draw (const HlPen *pen)
{
  static const double zigzag[][2] = {
    { 1.9, 0.0 }, { 1.05, 0.0 }, { 0.55, -0.85 }, { -0.1, 0.75 }, { -0.6, -0.45 }, { -0.9, 0.0 }, { -1.9, 0.0 } };
  const double level = 1.2, half_chord = sqrt (RADIUS * RADIUS - level * level);
  hl_pen_circle (pen, 0.0, 0.0, RADIUS);
  hl_pen_body (pen);
  hl_pen_path (pen, zigzag, G_N_ELEMENTS (zigzag));
  hl_pen_stroke (pen, &pen->theme->ink, 0.8);
  cairo_move_to (pen->cr, -half_chord * U, level * U);
  cairo_line_to (pen->cr, half_chord * U, level * U);
  hl_pen_stroke (pen, &pen->theme->ink, 0.5);
}

static double
lead (const HlComponent *component, double x, double y, HlSide side, double half_width)
{
  double off = (side == HL_SIDE_LEFT || side == HL_SIDE_RIGHT ? y : x) / U;
  (void) component;
  return half_width - sqrt (MAX (RADIUS * RADIUS - off * off, 0.0)) * U;
}

const HlSymbol hl_symbol_condenser = { "condenser", draw, lead };
