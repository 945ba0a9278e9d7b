/* Process steam user: box with a coil and an arrow of heat leaving it.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "draw/symbols/symbol-private.h"

#define HALF_WIDTH 1.8

static void
draw (const HlPen *pen)
{
  static const double coil[][2] = {
    { 0.0, -2.0 }, { 0.0, -1.45 }, { -1.2, -1.05 }, { 0.1, -0.5 }, { -1.2, 0.05 }, { 0.1, 0.6 }, { -1.2, 1.1 }, { 0.0, 1.45 }, { 0.0, 2.0 } };
  static const double heat[][2] = { { 0.35, 0.0 }, { 0.95, 0.0 } };
  hl_pen_box (pen, -HALF_WIDTH, -2.0, 2 * HALF_WIDTH, 4.0, 0.25);
  hl_pen_body (pen);
  hl_pen_path (pen, coil, G_N_ELEMENTS (coil));
  hl_pen_stroke (pen, &pen->theme->ink, 0.8);
  hl_pen_path (pen, heat, 2);
  hl_pen_stroke (pen, &pen->theme->steam, 0.9);
  hl_pen_arrow_head (pen, 1.5, 0.0, 1.0, 0.0, 0.7, &pen->theme->steam);
}

const HlSymbol hl_symbol_steam_user = { "steam_user", draw, NULL };
