/* Motor: circle with its letter.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "draw/symbols/symbol-private.h"

static void
draw (const HlPen *pen)
{
  hl_pen_circle (pen, 0.0, 0.0, 1.8);
  hl_pen_body (pen);
  hl_pen_letters (pen, "M", 0.0, 0.0, 14.0, TRUE);
}

const HlSymbol hl_symbol_motor = { "motor", draw, NULL };
