/* Ejector: nozzle in its suction chamber, and the diffuser behind it.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "draw/symbols/symbol-private.h"

static void
draw (const HlPen *pen)
{
  static const double body[][2] = { { -2.5, -1.2 }, { -0.2, -1.2 }, { 1.0, -0.45 }, { 3.0, -1.0 }, { 3.0, 1.0 }, { 1.0, 0.45 }, { -0.2, 1.2 }, { -2.5, 1.2 } };
  static const double nozzle[][2] = { { -2.5, -0.65 }, { -0.6, -0.15 }, { -0.6, 0.15 }, { -2.5, 0.65 } };
  hl_pen_path (pen, body, G_N_ELEMENTS (body));
  cairo_close_path (pen->cr);
  hl_pen_body (pen);
  hl_pen_path (pen, nozzle, G_N_ELEMENTS (nozzle));
  hl_pen_stroke (pen, &pen->theme->ink, 0.85);
}

static double
lead (const HlComponent *component, double x, double y, HlSide side, double half_width)
{
  (void) component; (void) x; (void) half_width;
  if (side == HL_SIDE_DOWN)
    return y - 1.2 * U;
  return side == HL_SIDE_LEFT ? 0.5 * U : 0.0;
}

const HlSymbol hl_symbol_ejector = { "ejector", draw, lead };
