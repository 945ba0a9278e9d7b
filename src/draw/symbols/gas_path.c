/* Ends of a gas path: source of hot gas, fan, stack.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include <math.h>
#include "draw/symbols/symbol-private.h"

/* A mouth that widens towards the path, and heat in waves. */
static void
draw_source (const HlPen *pen)
{
  static const double mouth[][2] = { { -1.8, -0.8 }, { 1.4, -1.6 }, { 1.4, 1.6 }, { -1.8, 0.8 }, { -1.8, -0.8 } };
  static const double out[][2] = { { 1.4, 0.0 }, { 2.0, 0.0 } };
  cairo_t *cr = pen->cr;
  hl_pen_path (pen, mouth, G_N_ELEMENTS (mouth));
  cairo_close_path (cr);
  hl_pen_body (pen);
  for (int k = -1; k <= 1; k++)
    {
      cairo_move_to (cr, -1.2 * U, 0.45 * k * U);
      cairo_curve_to (cr, -0.6 * U, (0.55 * k - 0.5) * U, -0.1 * U, (0.55 * k + 0.5) * U, 0.7 * U, 0.62 * k * U);
      hl_pen_stroke (pen, &pen->theme->gas, 0.7);
    }
  hl_pen_path (pen, out, 2);
  hl_pen_stroke (pen, &pen->theme->ink, 0.85);
}

/* A shaft that tapers on its foot. */
static void
draw_stack (const HlPen *pen)
{
  static const double shaft[][2] = { { -0.6, -3.0 }, { 0.6, -3.0 }, { 1.1, 3.0 }, { -1.1, 3.0 }, { -0.6, -3.0 } };
  static const double in[][2] = { { -2.0, 2.0 }, { -1.0, 2.0 } };
  cairo_t *cr = pen->cr;
  hl_pen_path (pen, shaft, G_N_ELEMENTS (shaft));
  cairo_close_path (cr);
  hl_pen_body (pen);
  hl_pen_path (pen, in, 2);
  hl_pen_stroke (pen, &pen->theme->ink, 0.85);
  cairo_move_to (cr, 0.0, 2.2 * U);
  cairo_curve_to (cr, -0.5 * U, 1.0 * U, 0.5 * U, 0.2 * U, 0.0, -1.0 * U);
  hl_pen_stroke (pen, &pen->theme->gas, 0.7);
  hl_pen_arrow_head (pen, 0.0, -1.6, 0.0, -1.0, 0.6, &pen->theme->gas);
}

/* A circle with two strokes that draw together towards the outlet. */
static void
draw_fan (const HlPen *pen)
{
  static const double upper[][2] = { { -0.9, -1.2 }, { 1.43, -0.45 } }, lower[][2] = { { -0.9, 1.2 }, { 1.43, 0.45 } };
  static const double in[][2] = { { -2.0, 0.0 }, { -1.5, 0.0 } }, out[][2] = { { 1.5, 0.0 }, { 2.0, 0.0 } };
  hl_pen_circle (pen, 0.0, 0.0, 1.5);
  hl_pen_body (pen);
  hl_pen_path (pen, upper, 2);
  hl_pen_stroke (pen, &pen->theme->ink, 0.85);
  hl_pen_path (pen, lower, 2);
  hl_pen_stroke (pen, &pen->theme->ink, 0.85);
  hl_pen_path (pen, in, 2);
  hl_pen_stroke (pen, &pen->theme->ink, 0.85);
  hl_pen_path (pen, out, 2);
  hl_pen_stroke (pen, &pen->theme->ink, 0.85);
}

const HlSymbol hl_symbol_gas_source = { "gas_source", draw_source, NULL };
const HlSymbol hl_symbol_stack = { "stack", draw_stack, NULL };
const HlSymbol hl_symbol_fan = { "fan", draw_fan, NULL };
