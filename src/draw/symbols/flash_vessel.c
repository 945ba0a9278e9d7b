/* Flash vessel: standing capsule with its level.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "draw/symbols/symbol-private.h"

static void
draw (const HlPen *pen)
{
  static const double level[][2] = { { -1.4, 0.9 }, { 1.4, 0.9 } };
  hl_pen_box (pen, -1.4, -3.0, 2.8, 6.0, 1.4);
  hl_pen_body (pen);
  hl_pen_path (pen, level, 2);
  hl_pen_stroke (pen, &pen->theme->ink, 0.5);
}

static double
lead (const HlComponent *component, double x, double y, HlSide side, double half_width)
{
  (void) component; (void) x; (void) y;
  return side == HL_SIDE_LEFT || side == HL_SIDE_RIGHT ? half_width - 1.4 * U : 0.0;
}

const HlSymbol hl_symbol_flash_vessel = { "flash_vessel", draw, lead };
