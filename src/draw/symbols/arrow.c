/* Make-up and boundary: named open arrows.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "draw/symbols/symbol-private.h"

#define HALF_LENGTH 1.8

static void
draw_arrow (const HlPen *pen)
{
  static const double outline[][2] = { { -HALF_LENGTH, -0.8 }, { 0.8, -0.8 }, { HALF_LENGTH, 0.0 }, { 0.8, 0.8 }, { -HALF_LENGTH, 0.8 } };
  hl_pen_path (pen, outline, G_N_ELEMENTS (outline));
  cairo_close_path (pen->cr);
  hl_pen_body (pen);
}

static void
draw_boundary (const HlPen *pen)
{
  static const double chevron[][2] = { { -0.55, -0.4 }, { -0.1, 0.0 }, { -0.55, 0.4 } };
  draw_arrow (pen);
  hl_pen_path (pen, chevron, G_N_ELEMENTS (chevron));
  hl_pen_stroke (pen, &pen->theme->ink, 0.6);
}

/* A drop of water in the arrow. */
static void
draw_make_up (const HlPen *pen)
{
  cairo_t *cr = pen->cr;
  draw_arrow (pen);
  cairo_save (cr);
  hl_pen_go_upright (pen, -0.5, 0.0);
  cairo_move_to (cr, 0.0, -0.55 * U);
  cairo_curve_to (cr, 0.12 * U, -0.25 * U, 0.36 * U, -0.05 * U, 0.36 * U, 0.2 * U);
  cairo_arc (cr, 0.0, 0.2 * U, 0.36 * U, 0.0, G_PI);
  cairo_curve_to (cr, -0.36 * U, -0.05 * U, -0.12 * U, -0.25 * U, 0.0, -0.55 * U);
  cairo_close_path (cr);
  hl_set_colour (cr, &pen->theme->water);
  cairo_fill (cr);
  cairo_restore (cr);
}

static double
lead (const HlComponent *component, double x, double y, HlSide side, double half_width)
{
  (void) component; (void) x; (void) y; (void) side;
  return half_width - HALF_LENGTH * U;
}

const HlSymbol hl_symbol_make_up = { "make_up", draw_make_up, lead };
const HlSymbol hl_symbol_boundary = { "boundary", draw_boundary, lead };
