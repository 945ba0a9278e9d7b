/* Draws the finished diagram: grid, dome, lines, dots, texts.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "draw/state-diagram-private.h"
#include "draw/text.h"
#include "plant/i18n.h"
#include <math.h>

static void
draw_ground (const HlStateDiagram *diagram, cairo_t *cr, const HlTheme *theme)
{
  cairo_rectangle (cr, 0.0, 0.0, diagram->width, diagram->height);
  hl_set_colour (cr, &theme->ground);
  cairo_fill (cr);
}

static void
clip_to_frame (const HlStateDiagram *diagram, cairo_t *cr)
{
  cairo_rectangle (cr, diagram->frame.x, diagram->frame.y, diagram->frame.width, diagram->frame.height);
  cairo_clip (cr);
}

static void
fill_dome (const HlStateDiagram *diagram, cairo_t *cr, const HlTheme *theme)
{
  cairo_save (cr);
  clip_to_frame (diagram, cr);
  hl_plot_series_path (diagram->outline, cr, &diagram->x_axis, &diagram->y_axis, TRUE);
  cairo_close_path (cr);
  hl_set_colour (cr, &theme->dome_fill);
  cairo_fill (cr);
  cairo_restore (cr);
}

static void
stroke_outline (const HlStateDiagram *diagram, cairo_t *cr, const HlTheme *theme, gboolean is_stale)
{
  cairo_save (cr);
  clip_to_frame (diagram, cr);
  hl_plot_series_path (diagram->outline, cr, &diagram->x_axis, &diagram->y_axis, TRUE);
  hl_set_colour (cr, hl_plot_colour (theme, diagram->outline->colour, is_stale));
  cairo_set_line_width (cr, diagram->outline->width);
  cairo_set_line_join (cr, CAIRO_LINE_JOIN_ROUND);
  cairo_stroke (cr);
  cairo_restore (cr);
}

static void
draw_text (cairo_t *cr, const HlTheme *theme, const char *text, const HlBox *box, double size, gboolean is_bold)
{
  hl_text_show (cr, theme, text, box->x + box->width / 2.0, box->y + HL_TEXT_BASELINE * size, 0, size, is_bold);
}

static void
draw_texts (const HlStateDiagram *diagram, cairo_t *cr, const HlTheme *theme)
{
  hl_set_colour (cr, &theme->quiet);
  for (guint i = 0; i < diagram->texts->len; i++)
    {
      const HlDiagramText *text = &g_array_index (diagram->texts, HlDiagramText, i);
      draw_text (cr, theme, text->text, &text->box, (text->kind == HL_TEXT_QUALITY ? 0.9 : 0.93) * diagram->text_size, FALSE);
    }
}

static gboolean
mark_has_stream (const HlMark *mark, int stream)
{
  for (guint i = 0; stream >= 0 && i < mark->n_streams; i++)
    if (mark->streams[i] == stream)
      return TRUE;
  return FALSE;
}

static void
draw_dot (const HlMark *mark, cairo_t *cr, const HlTheme *theme, gboolean is_stale, gboolean is_selected)
{
  cairo_set_dash (cr, NULL, 0, 0.0);
  /* Text leaves a current point, from which an arc would draw a line. */
  cairo_new_path (cr);
  if (is_selected)
    {
      cairo_arc (cr, mark->at.x, mark->at.y, mark->radius + 3.0, 0.0, 2.0 * G_PI);
      hl_set_colour (cr, &theme->accent);
      cairo_set_line_width (cr, 1.8);
      cairo_stroke (cr);
    }
  cairo_arc (cr, mark->at.x, mark->at.y, mark->radius, 0.0, 2.0 * G_PI);
  hl_set_colour (cr, &theme->ground);
  cairo_fill_preserve (cr);
  hl_set_colour (cr, hl_plot_colour (theme, mark->colour, is_stale));
  cairo_set_line_width (cr, mark->kind == HL_MARK_STATE ? 1.7 : 1.2);
  cairo_stroke (cr);
}

static void
draw_leader (const HlMark *mark, cairo_t *cr, const HlTheme *theme)
{
  if (!mark->label.is_placed || !mark->label.has_leader)
    return;
  cairo_move_to (cr, mark->label.leader[0].x, mark->label.leader[0].y);
  cairo_line_to (cr, mark->label.leader[1].x, mark->label.leader[1].y);
  hl_set_colour (cr, &theme->quiet);
  cairo_set_line_width (cr, 0.7);
  cairo_set_dash (cr, NULL, 0, 0.0);
  cairo_stroke (cr);
}

static void
draw_number (const HlStateDiagram *diagram, const HlMark *mark, cairo_t *cr, const HlTheme *theme, gboolean is_stale, gboolean is_selected)
{
  gboolean is_state = mark->kind == HL_MARK_STATE;
  if (!mark->label.is_placed)
    return;
  hl_set_colour (cr, is_selected ? &theme->accent : hl_plot_colour (theme, is_state ? HL_PLOT_INK : HL_PLOT_QUIET, is_stale));
  draw_text (cr, theme, mark->text, &mark->label.box, is_state ? diagram->number_size : 0.95 * diagram->text_size, is_state);
}

static const char *
axis_name (HlDimension dimension)
{
  switch (dimension)
    {
    case HL_DIMENSION_ENTROPY:
      return _("specific entropy");
    case HL_DIMENSION_ENTHALPY:
      return _("specific enthalpy");
    case HL_DIMENSION_PRESSURE:
      return _("pressure");
    default:
      return _("temperature");
    }
}

static void
draw_critical (const HlStateDiagram *diagram, cairo_t *cr, const HlTheme *theme, gboolean is_stale)
{
  cairo_save (cr);
  clip_to_frame (diagram, cr);
  cairo_new_path (cr);
  cairo_arc (cr, diagram->critical.x, diagram->critical.y, 2.6, 0.0, 2.0 * G_PI);
  hl_set_colour (cr, hl_plot_colour (theme, HL_PLOT_OUTLINE, is_stale));
  cairo_fill (cr);
  cairo_restore (cr);
}

/* On axes that were made for another solution a state may lie outside. */
static gboolean
mark_is_inside (const HlStateDiagram *diagram, const HlMark *mark)
{
  const HlBox *frame = &diagram->frame;
  return mark->at.x >= frame->x - 1.0 && mark->at.x <= frame->x + frame->width + 1.0
         && mark->at.y >= frame->y - 1.0 && mark->at.y <= frame->y + frame->height + 1.0;
}

/* Without its numbers: they would lie beside those of the present one. */
static void
draw_ghost (const HlStateDiagram *ghost, cairo_t *cr, const HlTheme *theme)
{
  cairo_push_group (cr);
  hl_plot_layer_draw (ghost->paths, cr, theme, &ghost->x_axis, &ghost->y_axis, NULL, 0, TRUE);
  for (guint i = 0; i < ghost->marks->len; i++)
    {
      const HlMark *mark = &g_array_index (ghost->marks, HlMark, i);
      if (mark->kind == HL_MARK_STATE)
        draw_dot (mark, cr, theme, TRUE, FALSE);
    }
  cairo_pop_group_to_source (cr);
  cairo_paint_with_alpha (cr, 0.7);
}

void
hl_state_diagram_draw (const HlStateDiagram *diagram, cairo_t *cr, const HlTheme *theme, gboolean is_stale, int selected_stream)
{
  hl_state_diagram_draw_over (diagram, NULL, cr, theme, is_stale, selected_stream);
}

void
hl_state_diagram_draw_over (const HlStateDiagram *diagram, const HlStateDiagram *ghost, cairo_t *cr, const HlTheme *theme,
                            gboolean is_stale, int selected_stream)
{
  g_autofree char *x_title = NULL, *y_title = NULL;
  g_return_if_fail (diagram != NULL && cr != NULL && theme != NULL);
  x_title = hl_plot_axis_title (&diagram->x_axis, axis_name (diagram->x_axis.dimension));
  y_title = hl_plot_axis_title (&diagram->y_axis, axis_name (diagram->y_axis.dimension));
  cairo_save (cr);
  draw_ground (diagram, cr, theme);
  fill_dome (diagram, cr, theme);
  hl_state_diagram_draw_areas (diagram, cr, theme, is_stale);
  hl_plot_axes_draw_grid (cr, theme, &diagram->x_axis, &diagram->y_axis);
  hl_plot_layer_draw (diagram->background, cr, theme, &diagram->x_axis, &diagram->y_axis,
                      (const HlBox *) (gpointer) diagram->gaps->data, diagram->gaps->len, is_stale);
  stroke_outline (diagram, cr, theme, is_stale);
  draw_critical (diagram, cr, theme, is_stale);
  hl_set_colour (cr, &theme->quiet);
  hl_plot_axes_draw_frame (cr, theme, &diagram->x_axis, &diagram->y_axis, x_title, y_title, diagram->text_size);
  if (ghost != NULL)
    draw_ghost (ghost, cr, theme);
  hl_plot_layer_draw (diagram->paths, cr, theme, &diagram->x_axis, &diagram->y_axis, NULL, 0, is_stale);
  draw_texts (diagram, cr, theme);
  for (guint i = 0; i < diagram->marks->len; i++)
    draw_leader (&g_array_index (diagram->marks, HlMark, i), cr, theme);
  for (int kind = HL_MARK_IDEAL; kind >= HL_MARK_STATE; kind--)
    for (guint i = 0; i < diagram->marks->len; i++)
      {
        const HlMark *mark = &g_array_index (diagram->marks, HlMark, i);
        gboolean is_selected = mark_has_stream (mark, selected_stream);
        if ((int) mark->kind != kind || !mark_is_inside (diagram, mark))
          continue;
        draw_dot (mark, cr, theme, is_stale, is_selected);
        draw_number (diagram, mark, cr, theme, is_stale, is_selected);
      }
  hl_state_diagram_draw_table (diagram, cr, theme);
  cairo_restore (cr);
}
