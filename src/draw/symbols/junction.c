/* Splitter and mixer: a dot where the lines meet.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "draw/symbols/symbol-private.h"

#define RADIUS 0.4

static void
draw_dot (const HlPen *pen)
{
  hl_pen_circle (pen, 0.0, 0.0, RADIUS);
  hl_set_colour (pen->cr, &pen->theme->ink);
  cairo_fill (pen->cr);
}

/* On the shelf the arms and their arrows tell a splitter from a mixer. */
static void
draw_arms (const HlPen *pen, gboolean is_splitter)
{
  static const double arms[][2][2] = { { { -1.0, 0.0 }, { 1.0, 0.0 } }, { { 0.0, 0.0 }, { 0.0, 1.0 } } };
  const HlColour *ink = &pen->theme->ink;
  for (guint i = 0; i < G_N_ELEMENTS (arms); i++)
    {
      hl_pen_path (pen, arms[i], 2);
      hl_pen_stroke (pen, ink, 0.8);
    }
  hl_pen_arrow_head (pen, 1.1, 0.0, 1.0, 0.0, 0.5, ink);
  if (is_splitter)
    hl_pen_arrow_head (pen, 0.0, 1.1, 0.0, 1.0, 0.5, ink);
  else
    {
      hl_pen_arrow_head (pen, -RADIUS, 0.0, 1.0, 0.0, 0.45, ink);
      hl_pen_arrow_head (pen, 0.0, RADIUS, 0.0, -1.0, 0.45, ink);
    }
}

static void
draw_splitter (const HlPen *pen)
{
  if (pen->is_icon)
    draw_arms (pen, TRUE);
  draw_dot (pen);
}

static void
draw_mixer (const HlPen *pen)
{
  if (pen->is_icon)
    draw_arms (pen, FALSE);
  draw_dot (pen);
}

static double
lead (const HlComponent *component, double x, double y, HlSide side, double half_width)
{
  (void) component; (void) x; (void) y; (void) side;
  return half_width - RADIUS * U;
}

const HlSymbol hl_symbol_splitter = { "splitter", draw_splitter, lead };
const HlSymbol hl_symbol_mixer = { "mixer", draw_mixer, lead };
