/* Organic expander: a small turbine with a ring, the molecule that it is made for.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "draw/symbols/symbol-private.h"

#define NARROW 1.0
#define WIDE 2.0

static void
draw (const HlPen *pen)
{
  static const double outline[][2] = { { -2.0, -NARROW }, { 2.0, -WIDE }, { 2.0, WIDE }, { -2.0, NARROW } };
  static const double ring[][2] = { { 0.9, 0.0 }, { 0.6, 0.52 }, { 0.0, 0.52 }, { -0.3, 0.0 }, { 0.0, -0.52 }, { 0.6, -0.52 }, { 0.9, 0.0 } };
  hl_pen_path (pen, outline, G_N_ELEMENTS (outline));
  cairo_close_path (pen->cr);
  hl_pen_body (pen);
  hl_pen_path (pen, ring, G_N_ELEMENTS (ring));
  hl_pen_stroke (pen, &pen->theme->steam, 0.7);
}

const HlSymbol hl_symbol_expander = { "expander", draw, NULL };
