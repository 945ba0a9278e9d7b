/* Moisture separator: vessel with baffles and falling drops.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "draw/symbols/symbol-private.h"

static void
draw (const HlPen *pen)
{
  hl_pen_box (pen, -1.8, -1.8, 3.6, 3.8, 0.6);
  hl_pen_body (pen);
  for (int k = -1; k <= 1; k++)
    {
      const double baffle[][2] = { { k * 0.9 - 0.25, -1.1 }, { k * 0.9 + 0.25, -0.6 }, { k * 0.9 - 0.25, -0.1 }, { k * 0.9 + 0.25, 0.4 } };
      hl_pen_path (pen, baffle, G_N_ELEMENTS (baffle));
      hl_pen_stroke (pen, &pen->theme->ink, 0.6);
      hl_pen_circle (pen, k * 0.7, 1.2, 0.16);
      hl_set_colour (pen->cr, &pen->theme->water);
      cairo_fill (pen->cr);
    }
}

static double
lead (const HlComponent *component, double x, double y, HlSide side, double half_width)
{
  (void) component; (void) x; (void) y;
  return side == HL_SIDE_LEFT || side == HL_SIDE_RIGHT ? half_width - 1.8 * U : 0.0;
}

const HlSymbol hl_symbol_moisture_separator = { "moisture_separator", draw, lead };
