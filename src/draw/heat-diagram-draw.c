/* Draws the finished heat diagram.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "draw/heat-diagram-private.h"
#include "draw/text.h"
#include "plant/i18n.h"

static void
draw_ground (const HlHeatDiagram *diagram, cairo_t *cr, const HlTheme *theme)
{
  cairo_rectangle (cr, 0.0, 0.0, diagram->width, diagram->height);
  hl_set_colour (cr, &theme->ground);
  cairo_fill (cr);
}

/* One line, set smaller until it fits. */
static void
draw_line (const HlHeatDiagram *diagram, cairo_t *cr, const HlTheme *theme, const char *text, double y, double size, gboolean is_bold)
{
  double x = hl_plot_axis_room_left (diagram->text_size), room = diagram->width - x - diagram->text_size, width = hl_text_width (theme, text, size, is_bold);
  if (width > room)
    size *= MAX (room / width * 0.98, 0.3);
  hl_text_show (cr, theme, text, x, y, -1, size, is_bold);
}

static void
draw_head (const HlHeatDiagram *diagram, cairo_t *cr, const HlTheme *theme)
{
  hl_set_colour (cr, &theme->ink);
  draw_line (diagram, cr, theme, diagram->title, 1.8 * diagram->text_size, 1.25 * diagram->text_size, TRUE);
  hl_set_colour (cr, &theme->quiet);
  draw_line (diagram, cr, theme, diagram->remark, 3.3 * diagram->text_size, diagram->text_size, FALSE);
}

static void
draw_borders (const HlHeatDiagram *diagram, cairo_t *cr, const HlTheme *theme)
{
  const double dashes[] = { 1.3, 2.9 };
  for (guint i = 0; i < diagram->curve->borders->len; i++)
    {
      double x = hl_plot_axis_to_pixel (&diagram->heat_axis, g_array_index (diagram->curve->borders, double, i));
      cairo_move_to (cr, x, diagram->frame.y);
      cairo_line_to (cr, x, diagram->frame.y + diagram->frame.height);
    }
  hl_set_colour (cr, &theme->quiet);
  cairo_set_line_width (cr, 0.8);
  cairo_set_dash (cr, dashes, 2, 0.0);
  cairo_stroke (cr);
  cairo_set_dash (cr, NULL, 0, 0.0);
}

static void
draw_gap (const HlHeatGap *gap, cairo_t *cr, const HlTheme *theme, gboolean is_stale)
{
  const HlColour *colour = gap->is_pinch && !is_stale ? &theme->accent : &theme->quiet;
  hl_set_colour (cr, colour);
  cairo_move_to (cr, gap->hot.x, gap->hot.y);
  cairo_line_to (cr, gap->cold.x, gap->cold.y);
  cairo_set_line_width (cr, gap->is_pinch ? 2.0 : 0.9);
  cairo_stroke (cr);
  for (int end = 0; end <= 1; end++)
    {
      const HlPoint *at = end == 0 ? &gap->hot : &gap->cold;
      cairo_new_path (cr);
      cairo_arc (cr, at->x, at->y, gap->is_pinch ? 3.4 : 2.2, 0.0, 2.0 * G_PI);
      hl_set_colour (cr, gap->is_pinch ? &theme->ground : colour);
      cairo_fill_preserve (cr);
      hl_set_colour (cr, colour);
      cairo_set_line_width (cr, gap->is_pinch ? 1.7 : 0.8);
      cairo_stroke (cr);
    }
}

static void
draw_texts (const HlHeatDiagram *diagram, cairo_t *cr, const HlTheme *theme, gboolean is_stale)
{
  for (guint i = 0; i < diagram->texts->len; i++)
    {
      const HlHeatText *text = &g_array_index (diagram->texts, HlHeatText, i);
      gboolean is_pinch = text->kind == HL_HEAT_TEXT_PINCH;
      hl_set_colour (cr, is_pinch && !is_stale ? &theme->accent : text->kind == HL_HEAT_TEXT_ZONE || is_stale ? &theme->quiet : &theme->ink);
      hl_text_show (cr, theme, text->text, text->box.x + text->box.width / 2.0, text->box.y + 0.80 * text->size, 0, text->size, is_pinch);
    }
}

static void
draw_empty (const HlHeatDiagram *diagram, cairo_t *cr, const HlTheme *theme)
{
  const char *text = _("No heat transfer is known here yet.");
  double size = diagram->text_size, width = hl_text_width (theme, text, size, FALSE);
  if (width > diagram->width * 0.95)
    size *= diagram->width * 0.95 / width;
  hl_set_colour (cr, &theme->quiet);
  hl_text_show (cr, theme, text, diagram->width / 2.0, diagram->height / 2.0, 0, size, FALSE);
}

void
hl_heat_diagram_draw (const HlHeatDiagram *diagram, cairo_t *cr, const HlTheme *theme, gboolean is_stale)
{
  g_autofree char *x_title = NULL, *y_title = NULL;
  g_return_if_fail (diagram != NULL && cr != NULL && theme != NULL);
  cairo_save (cr);
  draw_ground (diagram, cr, theme);
  if (diagram->curve == NULL)
    {
      draw_empty (diagram, cr, theme);
      cairo_restore (cr);
      return;
    }
  x_title = hl_plot_axis_title (&diagram->heat_axis, _("heat transferred"));
  y_title = hl_plot_axis_title (&diagram->T_axis, _("temperature"));
  draw_head (diagram, cr, theme);
  hl_plot_axes_draw_grid (cr, theme, &diagram->heat_axis, &diagram->T_axis);
  draw_borders (diagram, cr, theme);
  hl_plot_axes_draw_frame (cr, theme, &diagram->heat_axis, &diagram->T_axis, x_title, y_title, diagram->text_size);
  hl_plot_layer_draw (diagram->curves, cr, theme, &diagram->heat_axis, &diagram->T_axis, NULL, 0, is_stale);
  for (guint i = diagram->gaps->len; i-- > 0;)
    draw_gap (&g_array_index (diagram->gaps, HlHeatGap, i), cr, theme, is_stale);
  draw_texts (diagram, cr, theme, is_stale);
  cairo_restore (cr);
}
