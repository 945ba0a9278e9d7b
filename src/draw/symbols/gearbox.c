/* Gearbox: box with a crossed line.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "draw/symbols/symbol-private.h"

static void
draw (const HlPen *pen)
{
  static const double first[][2] = { { -1.5, -1.5 }, { 1.5, 1.5 } }, second[][2] = { { -1.5, 1.5 }, { 1.5, -1.5 } };
  hl_pen_box (pen, -1.5, -1.5, 3.0, 3.0, 0.0);
  hl_pen_body (pen);
  hl_pen_path (pen, first, 2);
  hl_pen_stroke (pen, &pen->theme->ink, 0.7);
  hl_pen_path (pen, second, 2);
  hl_pen_stroke (pen, &pen->theme->ink, 0.7);
}

const HlSymbol hl_symbol_gearbox = { "gearbox", draw, NULL };
