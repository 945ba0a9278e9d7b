/* Expansion valve: a small and a large triangle tip to tip, with a membrane drive.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "draw/symbols/symbol-private.h"

#define HALF_LENGTH 1.4

static void
draw (const HlPen *pen)
{
  static const double outline[][2] = { { -HALF_LENGTH, -0.5 }, { 0.0, 0.0 }, { HALF_LENGTH, -1.0 }, { HALF_LENGTH, 1.0 }, { 0.0, 0.0 }, { -HALF_LENGTH, 0.5 } };
  static const double stem[][2] = { { 0.0, 0.0 }, { 0.0, -0.75 } };
  static const double cap[][2] = { { -0.45, -0.75 }, { 0.45, -0.75 } };
  hl_pen_path (pen, outline, G_N_ELEMENTS (outline));
  cairo_close_path (pen->cr);
  hl_pen_body (pen);
  hl_pen_path (pen, stem, G_N_ELEMENTS (stem));
  hl_pen_stroke (pen, &pen->theme->ink, 0.8);
  hl_pen_path (pen, cap, G_N_ELEMENTS (cap));
  hl_pen_stroke (pen, &pen->theme->ink, 1.0);
}

static double
lead (const HlComponent *component, double x, double y, HlSide side, double half_width)
{
  (void) component; (void) x; (void) y; (void) side;
  return half_width - HALF_LENGTH * U;
}

const HlSymbol hl_symbol_expansion_valve = { "expansion_valve", draw, lead };
