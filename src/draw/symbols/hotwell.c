/* Hotwell: a lying vessel with its level.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "draw/symbols/symbol-private.h"

static void
draw (const HlPen *pen)
{
  static const double level[][2] = { { -2.85, -0.15 }, { 2.85, -0.15 } };
  hl_pen_box (pen, -3.0, -1.0, 6.0, 2.0, 0.5);
  hl_pen_body (pen);
  hl_pen_path (pen, level, 2);
  hl_pen_stroke (pen, &pen->theme->ink, 0.5);
  for (int k = -1; k <= 1; k++)
    {
      cairo_move_to (pen->cr, (k * 1.6 - 0.45) * U, 0.35 * U);
      cairo_line_to (pen->cr, (k * 1.6 + 0.45) * U, 0.35 * U);
    }
  hl_pen_stroke (pen, &pen->theme->water, 0.7);
}

const HlSymbol hl_symbol_hotwell = { "hotwell", draw, NULL };
