/* Fired boiler: box with coil and flame.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "draw/symbols/symbol-private.h"

static void
draw_flame (const HlPen *pen)
{
  cairo_t *cr = pen->cr;
  const double x = 0.25 * U, top = 0.15 * U, bottom = 1.85 * U, width = 0.62 * U;
  cairo_move_to (cr, x + 0.12 * U, top);
  cairo_curve_to (cr, x + 0.05 * U, top + 0.55 * U, x - width, top + 0.7 * U, x - width, bottom - 0.55 * U);
  cairo_curve_to (cr, x - width, bottom - 0.15 * U, x - 0.3 * U, bottom, x, bottom);
  cairo_curve_to (cr, x + 0.35 * U, bottom, x + width, bottom - 0.2 * U, x + width, bottom - 0.6 * U);
  cairo_curve_to (cr, x + width, top + 0.75 * U, x + 0.3 * U, top + 0.65 * U, x + 0.12 * U, top);
  cairo_close_path (cr);
  hl_pen_stroke (pen, &pen->theme->steam, 0.8);
}

static void
draw (const HlPen *pen)
{
  hl_symbol_draw_furnace (pen, draw_flame);
}

const HlSymbol hl_symbol_boiler = { "boiler", draw, hl_symbol_furnace_lead };
