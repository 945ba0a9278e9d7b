/* Evaporator: an exchanger in which bubbles rise.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "draw/symbols/symbol-private.h"

#define RADIUS 1.9

static void
draw (const HlPen *pen)
{
  static const double coil[][2] = { { 1.9, 0.0 }, { 1.2, 0.0 }, { 0.8, 0.55 }, { 0.0, -0.55 }, { -0.8, 0.55 }, { -1.2, 0.0 }, { -1.9, 0.0 } };
  static const double bubbles[][3] = { { -0.6, -0.9, 0.22 }, { 0.35, -1.15, 0.3 }, { 0.95, -0.75, 0.18 } };
  hl_pen_circle (pen, 0.0, 0.0, RADIUS);
  hl_pen_body (pen);
  hl_pen_path (pen, coil, G_N_ELEMENTS (coil));
  hl_pen_stroke (pen, &pen->theme->ink, 0.8);
  for (guint i = 0; i < G_N_ELEMENTS (bubbles); i++)
    {
      hl_pen_circle (pen, bubbles[i][0], bubbles[i][1], bubbles[i][2]);
      hl_pen_stroke (pen, &pen->theme->steam, 0.6);
    }
}

static double
lead (const HlComponent *component, double x, double y, HlSide side, double half_width)
{
  (void) component; (void) x; (void) y; (void) side;
  return half_width - RADIUS * U;
}

const HlSymbol hl_symbol_evaporator = { "evaporator", draw, lead };
