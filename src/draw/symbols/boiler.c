/* Fired boiler: box with coil and flame.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "draw/symbols/symbol-private.h"

static void
draw_flame (const HlPen *pen)
{
  cairo_t *cr = pen->cr;
  cairo_save (cr);
  hl_pen_go_upright (pen, 0.25, 1.05);
  cairo_scale (cr, U, U);
  cairo_move_to (cr, 0.1, -1.0);
  cairo_curve_to (cr, 0.25, -0.45, 0.72, -0.1, 0.72, 0.38);
  cairo_curve_to (cr, 0.72, 0.74, 0.4, 0.95, 0.0, 0.95);
  cairo_curve_to (cr, -0.4, 0.95, -0.7, 0.7, -0.7, 0.32);
  cairo_curve_to (cr, -0.7, 0.0, -0.5, -0.2, -0.42, -0.5);
  cairo_curve_to (cr, -0.27, -0.36, -0.18, -0.24, -0.13, -0.08);
  cairo_curve_to (cr, 0.05, -0.3, 0.16, -0.62, 0.1, -1.0);
  cairo_close_path (cr);
  cairo_restore (cr);
  hl_pen_stroke (pen, &pen->theme->steam, 0.8);
}

static void
draw (const HlPen *pen)
{
  hl_symbol_draw_furnace (pen, draw_flame);
}

const HlSymbol hl_symbol_boiler = { "boiler", draw, hl_symbol_furnace_lead };
