/* Compressor: a trapezium that narrows with the flow.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "draw/symbols/symbol-private.h"

static void
draw (const HlPen *pen)
{
  static const double outline[][2] = { { -2.0, -2.0 }, { 2.0, -1.0 }, { 2.0, 1.0 }, { -2.0, 2.0 } };
  hl_pen_path (pen, outline, G_N_ELEMENTS (outline));
  cairo_close_path (pen->cr);
  hl_pen_body (pen);
}

const HlSymbol hl_symbol_compressor = { "compressor", draw, NULL };
