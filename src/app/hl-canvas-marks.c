/* Marks of what differs: badges at components and labels, and in a comparison what is gone, as a ghost.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "app/hl-canvas-private.h"
#include "app/hl-appearance.h"
#include "plant/i18n.h"

#define BADGE 7.0          /* radius at zoom 1 [px] */
#define ROOM 10.0          /* half the box that a badge is drawn in, in radii of 7 px */

void
hl_canvas_update_marks (HlCanvas *self)
{
  HlPlant *reference = hl_session_reference (self->session, NULL), *plant = hl_canvas_plant (self);
  if (reference == self->marked_reference && plant == self->marked_plant && hl_session_is_comparing (self->session) == self->has_ghosts)
    return;
  hl_canvas_forget_marks (self);
  if (reference == NULL)
    return;
  self->marked_reference = hl_plant_ref (reference);
  self->marked_plant = hl_plant_ref (plant);
  self->marks = hl_marks_new (reference, plant);
  self->has_ghosts = hl_session_is_comparing (self->session);
  if (self->has_ghosts && hl_marks_count (self->marks, HL_MARK_REMOVED) > 0)
    self->ghosts = hl_layout_new (reference, NULL, hl_appearance_theme ());
}

void
hl_canvas_forget_marks (HlCanvas *self)
{
  g_clear_pointer (&self->marks, hl_marks_free);
  g_clear_pointer (&self->ghosts, hl_layout_unref);
  g_clear_pointer (&self->marked_reference, hl_plant_unref);
  g_clear_pointer (&self->marked_plant, hl_plant_unref);
  self->has_ghosts = FALSE;
}

const char *
hl_canvas_mark_words (HlCanvas *self, const char *id)
{
  HlMark mark = self->marks != NULL ? hl_marks_of (self->marks, id) : HL_MARK_NONE;
  return mark != HL_MARK_NONE ? hl_mark_name (mark) : NULL;
}

static void
draw_badge (HlCanvas *self, GtkSnapshot *snapshot, HlMark mark, double x, double y)
{
  double vx, vy, radius = BADGE * CLAMP (self->zoom, 0.75, 1.5), half = ROOM / 7.0 * radius;
  cairo_t *cr;
  hl_canvas_to_view (self, x, y, &vx, &vy);
  cr = gtk_snapshot_append_cairo (snapshot, &GRAPHENE_RECT_INIT ((float) (vx - half), (float) (vy - half), (float) (2 * half), (float) (2 * half)));
  hl_draw_mark (cr, hl_appearance_theme (), mark, vx, vy, radius);
  cairo_destroy (cr);
}

/* At the upper left corner of a symbol: titles stand at the other sides, and ports end at the middle of an edge. */
static void
badge_component (HlCanvas *self, GtkSnapshot *snapshot, const HlComponent *component, HlMark mark)
{
  int hw, hh;
  hl_component_half_size (component, &hw, &hh);
  draw_badge (self, snapshot, mark, (component->x - hw) * HL_UNIT - 1, (component->y - hh) * HL_UNIT - 1);
}

static void
badge_stream (HlCanvas *self, GtkSnapshot *snapshot, const HlStreamPlace *place, HlMark mark)
{
  if (place->label.width > 0)
    draw_badge (self, snapshot, mark, place->label.x + place->label.width, place->label.y);
  else if (place->n_points > 1)
    draw_badge (self, snapshot, mark, (place->points[0].x + place->points[1].x) / 2, (place->points[0].y + place->points[1].y) / 2);
}

/* What is gone: its symbol pale, its line dashed, in the colour of what is taken away. */
static void
draw_ghost_streams (HlCanvas *self, cairo_t *cr)
{
  const GArray *streams = hl_marks_removed_streams (self->marks);
  const HlColour *colour = hl_mark_colour (hl_appearance_theme (), HL_MARK_REMOVED);
  cairo_set_source_rgba (cr, colour->r, colour->g, colour->b, 0.75);
  cairo_set_line_width (cr, 1.5);
  cairo_set_dash (cr, (double[]) { 6, 4 }, 2, 0);
  for (guint i = 0; i < streams->len; i++)
    {
      const HlStreamPlace *place = hl_layout_stream (self->ghosts, g_array_index (streams, guint, i));
      hl_draw_polyline (cr, place->points, place->n_points);
      cairo_stroke (cr);
    }
}

static void
draw_ghost_component (cairo_t *cr, const HlComponent *component)
{
  cairo_save (cr);
  cairo_translate (cr, component->x * HL_UNIT, component->y * HL_UNIT);
  cairo_push_group (cr);
  hl_draw_symbol (cr, hl_appearance_theme (), component);
  cairo_pop_group_to_source (cr);
  cairo_paint_with_alpha (cr, 0.4);
  cairo_restore (cr);
}

void
hl_canvas_draw_ghosts (HlCanvas *self, GtkSnapshot *snapshot)
{
  const GArray *components;
  cairo_t *cr;
  if (self->marks == NULL || self->ghosts == NULL)
    return;
  components = hl_marks_removed_components (self->marks);
  cr = gtk_snapshot_append_cairo (snapshot, &GRAPHENE_RECT_INIT (0, 0, (float) gtk_widget_get_width (GTK_WIDGET (self)),
                                                                 (float) gtk_widget_get_height (GTK_WIDGET (self))));
  cairo_translate (cr, self->ox, self->oy);
  cairo_scale (cr, self->zoom, self->zoom);
  draw_ghost_streams (self, cr);
  for (guint i = 0; i < components->len; i++)
    draw_ghost_component (cr, hl_plant_component (self->marked_reference, g_array_index (components, guint, i)));
  cairo_destroy (cr);
}

void
hl_canvas_draw_badges (HlCanvas *self, GtkSnapshot *snapshot)
{
  HlPlant *plant = hl_canvas_plant (self);
  if (self->marks == NULL)
    return;
  for (guint n = 0; n < hl_plant_n_components (plant); n++)
    {
      HlMark mark = hl_marks_of (self->marks, hl_plant_component (plant, n)->id);
      if (mark != HL_MARK_NONE)
        badge_component (self, snapshot, hl_plant_component (plant, n), mark);
    }
  for (guint n = 0; n < hl_plant_n_streams (plant); n++)
    {
      HlMark mark = hl_marks_of (self->marks, hl_plant_stream (plant, n)->id);
      if (mark != HL_MARK_NONE)
        badge_stream (self, snapshot, hl_layout_stream (self->layout, n), mark);
    }
  if (self->ghosts == NULL)
    return;
  for (guint i = 0; i < hl_marks_removed_components (self->marks)->len; i++)
    badge_component (self, snapshot, hl_plant_component (self->marked_reference, g_array_index (hl_marks_removed_components (self->marks), guint, i)),
                     HL_MARK_REMOVED);
}
