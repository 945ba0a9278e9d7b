/* Components dragged from the shelf onto the canvas, or into a line.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "app/hl-canvas-private.h"
#include "app/hl-edit.h"
#include "app/hl-shelf.h"
#include "app/hl-trace.h"

static const HlKind *
dropped_kind (const GValue *value)
{
  const char *text = value != NULL && G_VALUE_HOLDS_STRING (value) ? g_value_get_string (value) : NULL;
  if (text == NULL || !g_str_has_prefix (text, HL_SHELF_DRAG_PREFIX))
    return NULL;
  return hl_kind_lookup (text + strlen (HL_SHELF_DRAG_PREFIX));
}

guint
hl_canvas_segment_at (const HlStreamPlace *place, double x, double y, HlPoint *on_it)
{
  double nearest = G_MAXDOUBLE;
  guint found = 0;
  for (guint n = 0; n + 1 < place->n_points; n++)
    {
      HlPoint a = place->points[n], b = place->points[n + 1];
      HlPoint p = { CLAMP (x, MIN (a.x, b.x), MAX (a.x, b.x)), CLAMP (y, MIN (a.y, b.y), MAX (a.y, b.y)) };
      if (hypot (p.x - x, p.y - y) >= nearest)
        continue;
      nearest = hypot (p.x - x, p.y - y);
      *on_it = p;
      found = n;
    }
  return found;
}

int
hl_canvas_snap_to_line (const HlStreamPlace *place, int *gx, int *gy)
{
  HlPoint p = { *gx * HL_UNIT, *gy * HL_UNIT }, a, b;
  guint n = hl_canvas_segment_at (place, p.x, p.y, &p);
  if (place->n_points < 2)
    return 0;
  a = place->points[n];
  b = place->points[n + 1];
  *gx = (int) floor (p.x / HL_UNIT + 0.5);
  *gy = (int) floor (p.y / HL_UNIT + 0.5);
  return fabs (b.x - a.x) > fabs (b.y - a.y) ? (b.x > a.x ? 0 : 2) : (b.y > a.y ? 1 : 3);
}

/* Where a component dragged from the shelf would stand, and in which line. */
static void
aim_drop (HlCanvas *self, const HlKind *kind, double vx, double vy)
{
  hl_canvas_to_grid (self, vx, vy, &self->drop_x, &self->drop_y);
  self->drop_stream = hl_edit_can_insert (kind) ? hl_canvas_stream_at (self, vx, vy) : -1;
  self->drop_turn = 0;
  if (self->drop_stream >= 0)
    self->drop_turn = hl_canvas_snap_to_line (hl_layout_stream (self->layout, (guint) self->drop_stream), &self->drop_x, &self->drop_y);
}

static GdkDragAction
drop_motion_cb (GtkDropTarget *target, double vx, double vy, HlCanvas *self)
{
  self->drop_kind = dropped_kind (gtk_drop_target_get_value (target));
  if (self->drop_kind == NULL)
    return gtk_drop_target_get_value (target) == NULL ? GDK_ACTION_COPY : 0;
  aim_drop (self, self->drop_kind, vx, vy);
  hl_trace ("over %s %d %d", self->drop_kind->id, self->drop_x, self->drop_y);
  gtk_widget_queue_draw (GTK_WIDGET (self));
  return GDK_ACTION_COPY;
}

static void
forget_drop (HlCanvas *self)
{
  self->drop_kind = NULL;
  self->drop_stream = -1;
  gtk_widget_queue_draw (GTK_WIDGET (self));
}

static void
drop_leave_cb (GtkDropTarget *target, HlCanvas *self)
{
  forget_drop (self);
}

static gboolean
drop_cb (GtkDropTarget *target, const GValue *value, double vx, double vy, HlCanvas *self)
{
  const HlKind *kind = dropped_kind (value);
  if (kind == NULL)
    return FALSE;
  hl_canvas_put (self, kind, vx, vy);
  return TRUE;
}

void
hl_canvas_put (HlCanvas *self, const HlKind *kind, double vx, double vy)
{
  int gx, gy, stream;
  aim_drop (self, kind, vx, vy);
  stream = self->drop_stream;
  gx = self->drop_x;
  gy = self->drop_y;
  forget_drop (self);
  self->is_fitted = FALSE;     /* the view stays where the hand is */
  gtk_widget_grab_focus (GTK_WIDGET (self));
  if (stream >= 0)
    gtk_widget_activate_action (GTK_WIDGET (self), "win.insert-component", "(ssiii)", kind->id,
                                hl_plant_stream (hl_canvas_plant (self), (guint) stream)->id, gx, gy, self->drop_turn);
  else
    gtk_widget_activate_action (GTK_WIDGET (self), "win.add-component-at", "(sii)", kind->id, gx, gy);
}

/* --- through what lies over the canvas ------------------------------------------------- */

static gboolean
place_below (GtkDropTarget *target, double x, double y, HlCanvas *self, graphene_point_t *place)
{
  GtkWidget *cover = gtk_event_controller_get_widget (GTK_EVENT_CONTROLLER (target));
  return gtk_widget_compute_point (cover, GTK_WIDGET (self), &GRAPHENE_POINT_INIT ((float) x, (float) y), place);
}

static void
set_clear (GtkDropTarget *target, gboolean is_clear)
{
  gtk_widget_set_opacity (gtk_event_controller_get_widget (GTK_EVENT_CONTROLLER (target)), is_clear ? 0.2 : 1.0);
}

static GdkDragAction
motion_through_cb (GtkDropTarget *target, double x, double y, HlCanvas *self)
{
  graphene_point_t place;
  if (!place_below (target, x, y, self, &place))
    return 0;
  set_clear (target, TRUE);
  return drop_motion_cb (target, place.x, place.y, self);
}

static void
leave_through_cb (GtkDropTarget *target, HlCanvas *self)
{
  set_clear (target, FALSE);
  forget_drop (self);
}

static gboolean
drop_through_cb (GtkDropTarget *target, const GValue *value, double x, double y, HlCanvas *self)
{
  graphene_point_t place;
  set_clear (target, FALSE);
  return place_below (target, x, y, self, &place) && drop_cb (target, value, place.x, place.y, self);
}

void
hl_canvas_drop_through (HlCanvas *self, GtkWidget *cover)
{
  GtkDropTarget *target = gtk_drop_target_new (G_TYPE_STRING, GDK_ACTION_COPY);
  gtk_drop_target_set_preload (target, TRUE);
  g_signal_connect (target, "motion", G_CALLBACK (motion_through_cb), self);
  g_signal_connect (target, "leave", G_CALLBACK (leave_through_cb), self);
  g_signal_connect (target, "drop", G_CALLBACK (drop_through_cb), self);
  gtk_widget_add_controller (cover, GTK_EVENT_CONTROLLER (target));
}

void
hl_canvas_add_drop_target (HlCanvas *self)
{
  GtkDropTarget *target = gtk_drop_target_new (G_TYPE_STRING, GDK_ACTION_COPY);
  gtk_drop_target_set_preload (target, TRUE);
  g_signal_connect (target, "motion", G_CALLBACK (drop_motion_cb), self);
  g_signal_connect (target, "leave", G_CALLBACK (drop_leave_cb), self);
  g_signal_connect (target, "drop", G_CALLBACK (drop_cb), self);
  gtk_widget_add_controller (GTK_WIDGET (self), GTK_EVENT_CONTROLLER (target));
}
