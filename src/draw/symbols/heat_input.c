/* Heat input of no named source: box with coil and rising heat.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "draw/symbols/symbol-private.h"

static void
draw_heat (const HlPen *pen)
{
  cairo_save (pen->cr);
  hl_pen_go_upright (pen, 0.2, 1.0);
  for (int i = -1; i <= 1; i++)
    {
      double x = i * 0.62;
      cairo_move_to (pen->cr, x * U, 0.85 * U);
      cairo_curve_to (pen->cr, (x - 0.45) * U, 0.4 * U, (x + 0.45) * U, 0.05 * U, x * U, -0.4 * U);
      hl_pen_stroke (pen, &pen->theme->steam, 0.8);
      hl_pen_arrow_head (pen, x - 0.03, -0.85, -0.25, -0.97, 0.6, &pen->theme->steam);
    }
  cairo_restore (pen->cr);
}

static void
draw (const HlPen *pen)
{
  hl_symbol_draw_furnace (pen, draw_heat);
}

const HlSymbol hl_symbol_heat_input = { "heat_input", draw, hl_symbol_furnace_lead };
