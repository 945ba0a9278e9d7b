/* Generator: circle with its letter and the sign of alternating current.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "draw/symbols/symbol-private.h"
#include "draw/text.h"

static void
draw (const HlPen *pen)
{
  cairo_t *cr = pen->cr;
  hl_pen_circle (pen, 0.0, 0.0, 1.8);
  hl_pen_body (pen);
  cairo_save (cr);
  hl_pen_go_upright (pen, 0.0, 0.0);
  hl_set_colour (cr, &pen->theme->ink);
  hl_text_show (cr, pen->theme, "G", 0.0, 0.25 * U, 0, 14.0, TRUE);
  cairo_move_to (cr, -0.6 * U, 0.95 * U);
  cairo_curve_to (cr, -0.3 * U, 0.45 * U, -0.1 * U, 0.6 * U, 0.0, 0.85 * U);
  cairo_curve_to (cr, 0.1 * U, 1.1 * U, 0.3 * U, 1.25 * U, 0.6 * U, 0.75 * U);
  hl_pen_stroke (pen, &pen->theme->ink, 0.65);
  cairo_restore (cr);
}

const HlSymbol hl_symbol_generator = { "generator", draw, NULL };
