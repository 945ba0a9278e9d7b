/* Strokes and shapes that the symbols are made of.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include <math.h>
#include "draw/symbols/symbol-private.h"
#include "draw/text.h"

void
hl_pen_stroke (const HlPen *pen, const HlColour *colour, double weight)
{
  hl_set_colour (pen->cr, colour);
  cairo_set_line_width (pen->cr, pen->stroke * weight);
  cairo_stroke (pen->cr);
}

void
hl_pen_body (const HlPen *pen)
{
  hl_set_colour (pen->cr, &pen->theme->card);
  cairo_fill_preserve (pen->cr);
  hl_pen_stroke (pen, &pen->theme->ink, 1.0);
}

void
hl_pen_path (const HlPen *pen, const double (*points)[2], guint n_points)
{
  cairo_move_to (pen->cr, points[0][0] * U, points[0][1] * U);
  for (guint i = 1; i < n_points; i++)
    cairo_line_to (pen->cr, points[i][0] * U, points[i][1] * U);
}

void
hl_pen_box (const HlPen *pen, double x, double y, double width, double height, double radius)
{
  double left = x * U, top = y * U, right = (x + width) * U, bottom = (y + height) * U, r = radius * U;
  cairo_new_sub_path (pen->cr);
  cairo_arc (pen->cr, right - r, top + r, r, -G_PI_2, 0.0);
  cairo_arc (pen->cr, right - r, bottom - r, r, 0.0, G_PI_2);
  cairo_arc (pen->cr, left + r, bottom - r, r, G_PI_2, G_PI);
  cairo_arc (pen->cr, left + r, top + r, r, G_PI, 1.5 * G_PI);
  cairo_close_path (pen->cr);
}

void
hl_pen_circle (const HlPen *pen, double x, double y, double radius)
{
  cairo_new_sub_path (pen->cr);
  cairo_arc (pen->cr, x * U, y * U, radius * U, 0.0, 2.0 * G_PI);
  cairo_close_path (pen->cr);
}

void
hl_pen_go_upright (const HlPen *pen, double x, double y)
{
  cairo_translate (pen->cr, x * U, y * U);
  if (pen->component->is_mirrored)
    cairo_scale (pen->cr, -1.0, 1.0);
  cairo_rotate (pen->cr, -pen->component->turn * G_PI_2);
}

void
hl_pen_letters (const HlPen *pen, const char *text, double x, double y, double size, gboolean is_bold)
{
  cairo_save (pen->cr);
  hl_pen_go_upright (pen, x, y);
  hl_set_colour (pen->cr, &pen->theme->ink);
  hl_text_show (pen->cr, pen->theme, text, 0.0, size * 0.36, 0, size, is_bold);
  cairo_restore (pen->cr);
}

void
hl_pen_arrow_head (const HlPen *pen, double x, double y, double dx, double dy, double length, const HlColour *colour)
{
  double tip_x = x * U, tip_y = y * U, back = length * U, side = length * U * 0.42;
  cairo_move_to (pen->cr, tip_x, tip_y);
  cairo_line_to (pen->cr, tip_x - dx * back - dy * side, tip_y - dy * back + dx * side);
  cairo_line_to (pen->cr, tip_x - dx * back + dy * side, tip_y - dy * back - dx * side);
  cairo_close_path (pen->cr);
  hl_set_colour (pen->cr, colour);
  cairo_fill (pen->cr);
}

void
hl_pen_coil (const HlPen *pen, double x, double y_from, double y_to, double amplitude, guint n)
{
  double step = (y_to - y_from) / (n + 1);
  cairo_move_to (pen->cr, x * U, y_from * U);
  for (guint i = 0; i < n; i++)
    cairo_line_to (pen->cr, (x + (i % 2 == 0 ? amplitude : -amplitude)) * U, (y_from + (i + 1) * step) * U);
  cairo_line_to (pen->cr, x * U, y_to * U);
}
