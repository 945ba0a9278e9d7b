/* Heat input of no named source: box with coil and rising heat.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "draw/symbols/symbol-private.h"

static void
draw_heat (const HlPen *pen)
{
  for (int i = -1; i <= 1; i++)
    {
      double x = (0.2 + i * 0.62) * U;
      cairo_move_to (pen->cr, x, 1.85 * U);
      cairo_curve_to (pen->cr, x - 0.45 * U, 1.4 * U, x + 0.45 * U, 1.05 * U, x, 0.6 * U);
      hl_pen_stroke (pen, &pen->theme->steam, 0.8);
      hl_pen_arrow_head (pen, x / U - 0.03, 0.15, -0.25, -0.97, 0.6, &pen->theme->steam);
    }
}

static void
draw (const HlPen *pen)
{
  hl_symbol_draw_furnace (pen, draw_heat);
}

const HlSymbol hl_symbol_heat_input = { "heat_input", draw, hl_symbol_furnace_lead };
