/* Pointer and wheel on the canvas: select, move, rubber band, lines, pan, zoom.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "app/hl-canvas-private.h"
#include "app/hl-edit.h"
#include "plant/i18n.h"

#define THRESHOLD 8.0      /* a press becomes a drag after this [view px] */
#define LINE_REACH 5.0     /* a line is hit within this */

/* What lies under the pointer */

int
hl_canvas_stream_at (HlCanvas *self, double vx, double vy)
{
  double x, y;
  hl_canvas_to_canvas (self, vx, vy, &x, &y);
  return hl_layout_stream_at (self->layout, x, y, LINE_REACH / self->zoom);
}

static gboolean
is_in_box (const HlBox *box, double x, double y)
{
  return x >= box->x && x <= box->x + box->width && y >= box->y && y <= box->y + box->height;
}

int
hl_canvas_label_at (HlCanvas *self, double vx, double vy)
{
  double x, y;
  hl_canvas_to_canvas (self, vx, vy, &x, &y);
  for (guint n = hl_plant_n_streams (hl_canvas_plant (self)); n-- > 0; )
    {
      const HlBox *box = &hl_layout_stream (self->layout, n)->label;
      if (box->width > 0 && is_in_box (box, x, y))
        return (int) n;
    }
  return -1;
}

static void
set_cursor (HlCanvas *self, const char *name)
{
  gtk_widget_set_cursor_from_name (GTK_WIDGET (self), name);
}

static GdkModifierType
modifiers (GtkGesture *gesture)
{
  return gtk_event_controller_get_current_event_state (GTK_EVENT_CONTROLLER (gesture));
}

static gboolean
extends_selection (GtkGesture *gesture)
{
  return (modifiers (gesture) & (GDK_SHIFT_MASK | GDK_CONTROL_MASK)) != 0;
}

/* Press: what the drag would be is decided here, what it is after the threshold */

static void
press_component (HlCanvas *self, GtkGesture *gesture, const char *id)
{
  self->mode = MODE_PRESS_COMPONENT;
  self->grabbed = id;
  self->was_selected = hl_session_is_selected (self->session, id);
  if (extends_selection (gesture))
    hl_session_select (self->session, id, TRUE);
  else if (!self->was_selected)
    hl_session_select (self->session, id, FALSE);
  gtk_widget_grab_focus (GTK_WIDGET (hl_canvas_item (self, id)));
}

static void
press_stream (HlCanvas *self, GtkGesture *gesture, int stream, gboolean is_label)
{
  self->mode = is_label ? MODE_PRESS_LABEL : MODE_PRESS_STREAM;
  self->grabbed = hl_plant_stream (hl_canvas_plant (self), (guint) stream)->id;
  gtk_widget_grab_focus (GTK_WIDGET (self));
  hl_session_select (self->session, self->grabbed, extends_selection (gesture));
}

static void
drag_begin_cb (GtkGestureDrag *drag, double vx, double vy, HlCanvas *self)
{
  GtkGesture *gesture = GTK_GESTURE (drag);
  HlPortRef port;
  const char *id;
  int stream;

  self->start_x = self->last_x = vx;
  self->start_y = self->last_y = vy;
  self->start_ox = self->ox;
  self->start_oy = self->oy;
  if (self->is_space_down)
    self->mode = MODE_PAN;
  else if (hl_canvas_port_at (self, vx, vy, &port) || (port.port = NULL, hl_canvas_shaft_end_at (self, vx, vy, &port.id)))
    {
      gtk_widget_grab_focus (GTK_WIDGET (self));
      hl_canvas_begin_line (self, &port);
    }
  else if ((stream = hl_canvas_label_at (self, vx, vy)) >= 0)
    press_stream (self, gesture, stream, TRUE);
  else if ((id = hl_canvas_component_at (self, vx, vy)) != NULL)
    press_component (self, gesture, id);
  else if ((stream = hl_canvas_stream_at (self, vx, vy)) >= 0)
    press_stream (self, gesture, stream, FALSE);
  else
    {
      self->mode = MODE_PRESS_GROUND;
      gtk_widget_grab_focus (GTK_WIDGET (self));
    }
}

/* Drag */

static void
begin_move (HlCanvas *self)
{
  self->mode = MODE_MOVE;
  self->base = hl_plant_ref (hl_canvas_plant (self));
  self->grid_dx = self->grid_dy = 0;
  if (!hl_session_is_selected (self->session, self->grabbed))
    hl_session_select (self->session, self->grabbed, FALSE);
  set_cursor (self, "grabbing");
}

static void
update_move (HlCanvas *self, double dx, double dy)
{
  int gx = (int) floor (dx / self->zoom / HL_UNIT + 0.5), gy = (int) floor (dy / self->zoom / HL_UNIT + 0.5);
  guint n;
  const char *const *ids = hl_session_selection (self->session, &n);
  if (gx == self->grid_dx && gy == self->grid_dy)
    return;
  self->grid_dx = gx;
  self->grid_dy = gy;
  hl_session_preview (self->session, hl_edit_move (self->base, ids, n, gx, gy), FALSE);
}

static void
begin_label (HlCanvas *self)
{
  int n = hl_plant_stream_index (hl_canvas_plant (self), self->grabbed);
  const HlBox *box = &hl_layout_stream (self->layout, (guint) n)->label;
  self->mode = MODE_LABEL;
  self->base = hl_plant_ref (hl_canvas_plant (self));
  /* Where the label's middle stood at the press; the drag adds to it. */
  self->grid_dx = (int) floor ((box->x + box->width / 2) / HL_UNIT + 0.5);
  self->grid_dy = (int) floor ((box->y + box->height / 2) / HL_UNIT + 0.5);
  set_cursor (self, "grabbing");
}

static void
label_place (HlCanvas *self, double dx, double dy, int *gx, int *gy)
{
  *gx = self->grid_dx + (int) floor (dx / self->zoom / HL_UNIT + 0.5);
  *gy = self->grid_dy + (int) floor (dy / self->zoom / HL_UNIT + 0.5);
}

static void
update_label (HlCanvas *self, double dx, double dy)
{
  int gx, gy;
  label_place (self, dx, dy, &gx, &gy);
  hl_session_preview (self->session, hl_edit_place_label (self->base, self->grabbed, TRUE, gx, gy), FALSE);
}

/* At one of its ends a line is taken off the port, elsewhere its segment is moved aside. */
static void
begin_line_drag (HlCanvas *self)
{
  HlPortRef stays;
  const char *stream;
  if (hl_canvas_line_end_at (self, self->start_x, self->start_y, &stream, &stays))
    hl_canvas_begin_replug (self, stream, &stays);
  else
    {
      hl_canvas_begin_bend (self);
      set_cursor (self, "grabbing");
    }
}

static void
cross_threshold (HlCanvas *self, GtkGesture *gesture)
{
  /* Claimed, or the click under it would be answered as well. */
  gtk_gesture_set_state (gesture, GTK_EVENT_SEQUENCE_CLAIMED);
  if (self->mode == MODE_PRESS_COMPONENT)
    begin_move (self);
  else if (self->mode == MODE_PRESS_LABEL)
    begin_label (self);
  else if (self->mode == MODE_PRESS_STREAM)
    begin_line_drag (self);
  else if (self->mode == MODE_PRESS_GROUND)
    self->mode = MODE_RUBBER;
}

static void
drag_update_cb (GtkGestureDrag *drag, double dx, double dy, HlCanvas *self)
{
  self->last_x = self->start_x + dx;
  self->last_y = self->start_y + dy;
  if (hypot (dx, dy) > THRESHOLD)
    cross_threshold (self, GTK_GESTURE (drag));
  if (self->mode == MODE_MOVE)
    update_move (self, dx, dy);
  else if (self->mode == MODE_LABEL)
    update_label (self, dx, dy);
  else if (self->mode == MODE_BEND)
    hl_canvas_update_bend (self, dx, dy);
  else if (self->mode == MODE_PAN)
    hl_canvas_pan_to (self, self->start_ox + dx, self->start_oy + dy);
  else if (self->mode == MODE_CONNECT || self->mode == MODE_SHAFT)
    hl_canvas_update_line (self, self->last_x, self->last_y);
  else if (self->mode == MODE_RUBBER)
    gtk_widget_queue_draw (GTK_WIDGET (self));
}

/* Release */

static void
select_in_rubber (HlCanvas *self, gboolean extend)
{
  HlPlant *plant = hl_canvas_plant (self);
  g_autoptr (GPtrArray) ids = g_ptr_array_new ();
  double left, top, right, bottom;
  guint n_old = 0;
  const char *const *old = hl_session_selection (self->session, &n_old);

  for (guint n = 0; extend && n < n_old; n++)
    g_ptr_array_add (ids, (gpointer) old[n]);
  hl_canvas_to_canvas (self, MIN (self->start_x, self->last_x), MIN (self->start_y, self->last_y), &left, &top);
  hl_canvas_to_canvas (self, MAX (self->start_x, self->last_x), MAX (self->start_y, self->last_y), &right, &bottom);
  for (guint n = 0; n < hl_plant_n_components (plant); n++)
    {
      const HlComponent *component = hl_plant_component (plant, n);
      int hw, hh;
      hl_component_half_size (component, &hw, &hh);
      if ((component->x - hw) * HL_UNIT < right && (component->x + hw) * HL_UNIT > left
          && (component->y - hh) * HL_UNIT < bottom && (component->y + hh) * HL_UNIT > top)
        g_ptr_array_add (ids, (gpointer) component->id);
    }
  hl_session_select_many (self->session, (const char *const *) ids->pdata, ids->len);
}

static void
end_label (HlCanvas *self, double dx, double dy)
{
  int gx, gy;
  label_place (self, dx, dy, &gx, &gy);
  gtk_widget_activate_action (GTK_WIDGET (self), "win.move-label", "(sii)", self->grabbed, gx, gy);
}

static void
end_click_on_component (HlCanvas *self, GtkGesture *gesture)
{
  guint n;
  hl_session_selection (self->session, &n);
  if (!extends_selection (gesture) && n > 1)
    hl_session_select (self->session, self->grabbed, FALSE);
}

static void
drag_end_cb (GtkGestureDrag *drag, double dx, double dy, HlCanvas *self)
{
  HlCanvasMode mode = self->mode;
  GtkGesture *gesture = GTK_GESTURE (drag);

  self->last_x = self->start_x + dx;
  self->last_y = self->start_y + dy;
  if (mode != MODE_CONNECT)
    g_clear_pointer (&self->base, hl_plant_unref);
  if (mode == MODE_CONNECT || mode == MODE_SHAFT)
    {
      hl_canvas_end_line (self);
      return;
    }
  self->mode = MODE_NONE;
  set_cursor (self, NULL);
  if (mode == MODE_MOVE)
    gtk_widget_activate_action (GTK_WIDGET (self), "win.move", "(ii)", self->grid_dx, self->grid_dy);
  else if (mode == MODE_LABEL)
    end_label (self, dx, dy);
  else if (mode == MODE_BEND)
    hl_canvas_end_bend (self, dx, dy);
  else if (mode == MODE_RUBBER)
    select_in_rubber (self, extends_selection (gesture));
  else if (mode == MODE_PRESS_GROUND && !extends_selection (gesture))
    hl_session_select (self->session, NULL, FALSE);
  else if (mode == MODE_PRESS_COMPONENT)
    end_click_on_component (self, gesture);
  gtk_widget_queue_draw (GTK_WIDGET (self));
}

gboolean
hl_canvas_cancel (HlCanvas *self)
{
  HlCanvasMode mode = self->mode;
  gtk_widget_grab_focus (GTK_WIDGET (self));
  if (mode == MODE_NONE)
    return FALSE;
  self->mode = MODE_NONE;
  g_clear_pointer (&self->base, hl_plant_unref);
  hl_canvas_drop_line (self);
  hl_session_cancel_preview (self->session);
  set_cursor (self, NULL);
  gtk_widget_queue_draw (GTK_WIDGET (self));
  return TRUE;
}

static void
drag_cancel_cb (GtkGesture *gesture, GdkEventSequence *sequence, HlCanvas *self)
{
  if (self->mode != MODE_NONE)
    hl_canvas_cancel (self);
}

/* Pan by the middle button */

static void
pan_begin_cb (GtkGestureDrag *drag, double vx, double vy, HlCanvas *self)
{
  self->start_ox = self->ox;
  self->start_oy = self->oy;
  set_cursor (self, "grabbing");
}

static void
pan_update_cb (GtkGestureDrag *drag, double dx, double dy, HlCanvas *self)
{
  hl_canvas_pan_to (self, self->start_ox + dx, self->start_oy + dy);
}

static void
pan_end_cb (GtkGestureDrag *drag, double dx, double dy, HlCanvas *self)
{
  set_cursor (self, NULL);
}

/* Wheel, pinch */

static gboolean
scroll_cb (GtkEventControllerScroll *scroll, double dx, double dy, HlCanvas *self)
{
  GdkModifierType state = gtk_event_controller_get_current_event_state (GTK_EVENT_CONTROLLER (scroll));
  if ((state & GDK_CONTROL_MASK) != 0)
    hl_canvas_zoom_at (self, self->zoom * pow (1.15, -dy), self->last_x, self->last_y);
  else if ((state & GDK_SHIFT_MASK) != 0 && dx < 0.001 && dx > -0.001)
    hl_canvas_pan_to (self, self->ox - 48 * dy, self->oy);
  else
    hl_canvas_pan_to (self, self->ox - 48 * dx, self->oy - 48 * dy);
  return TRUE;
}

static void
pinch_begin_cb (GtkGesture *gesture, GdkEventSequence *sequence, HlCanvas *self)
{
  self->start_ox = self->zoom;    /* the zoom that the pinch scales */
}

static void
pinch_cb (GtkGestureZoom *gesture, double scale, HlCanvas *self)
{
  double vx, vy;
  if (gtk_gesture_get_bounding_box_center (GTK_GESTURE (gesture), &vx, &vy))
    hl_canvas_zoom_at (self, self->start_ox * scale, vx, vy);
}

/* Hover */

static void
set_hovered (HlCanvas *self, const char *id, const HlPortRef *hot)
{
  if (self->hovered == id && self->hot.id == hot->id && self->hot.port == hot->port)
    return;
  self->hovered = id;
  self->hot = *hot;
  gtk_widget_queue_draw (GTK_WIDGET (self));
}

static void
motion_cb (GtkEventControllerMotion *motion, double vx, double vy, HlCanvas *self)
{
  HlPortRef hot = { 0 };
  const char *id, *shaft = NULL;
  if (self->mode != MODE_NONE)
    return;
  self->last_x = vx;
  self->last_y = vy;
  id = hl_canvas_component_at (self, vx, vy);
  if (hl_canvas_port_at (self, vx, vy, &hot))
    id = hot.id;
  else if (hl_canvas_shaft_end_at (self, vx, vy, &shaft))
    id = shaft;
  set_hovered (self, id, &hot);
  if (self->is_space_down)
    set_cursor (self, "grab");
  else if (hot.port != NULL || shaft != NULL)
    set_cursor (self, "crosshair");
  else
    set_cursor (self, hl_canvas_label_at (self, vx, vy) >= 0 || id != NULL || hl_canvas_stream_at (self, vx, vy) >= 0 ? "pointer" : NULL);
}

static void
leave_cb (GtkEventControllerMotion *motion, HlCanvas *self)
{
  HlPortRef none = { 0 };
  set_hovered (self, NULL, &none);
}

/* What a port or a stream is, in words, where the pointer rests. */
static gboolean
query_stream_tooltip (HlCanvas *self, int vx, int vy, GtkTooltip *tooltip)
{
  int stream = hl_canvas_component_at (self, vx, vy) == NULL ? hl_canvas_stream_at (self, vx, vy) : -1;
  g_autofree char *text = NULL;
  if (stream < 0)
    return FALSE;
  text = hl_canvas_describe_stream (self, (guint) stream);
  gtk_tooltip_set_text (tooltip, text);
  return TRUE;
}

static gboolean
query_tooltip_cb (GtkWidget *widget, int vx, int vy, gboolean is_keyboard, GtkTooltip *tooltip, HlCanvas *self)
{
  const HlComponent *component = self->hot.id != NULL ? hl_plant_find_component (hl_canvas_plant (self), self->hot.id) : NULL;
  guint n;
  if (self->mode != MODE_NONE)
    return FALSE;
  if (component == NULL || self->hot.port == NULL || !hl_component_find_port (component, self->hot.port, &n))
    return query_stream_tooltip (self, vx, vy, tooltip);
  {
    g_autofree char *name = hl_component_port_name (component, n);
    g_autofree char *text = g_strdup_printf (_("%s: %s, open. Drag to connect."), component->id, name);
    gtk_tooltip_set_text (tooltip, text);
  }
  return TRUE;
}

/* Space held down pans */

static gboolean
key_pressed_cb (GtkEventControllerKey *keys, guint key, guint code, GdkModifierType state, HlCanvas *self)
{
  if (key != GDK_KEY_space)
    return FALSE;
  self->is_space_down = TRUE;
  set_cursor (self, "grab");
  return TRUE;
}

static void
key_released_cb (GtkEventControllerKey *keys, guint key, guint code, GdkModifierType state, HlCanvas *self)
{
  if (key != GDK_KEY_space)
    return;
  self->is_space_down = FALSE;
  set_cursor (self, NULL);
}

/* Set-up */

static GtkGesture *
add_gesture (HlCanvas *self, GtkGesture *gesture, guint button)
{
  gtk_gesture_single_set_button (GTK_GESTURE_SINGLE (gesture), button);
  gtk_widget_add_controller (GTK_WIDGET (self), GTK_EVENT_CONTROLLER (gesture));
  return gesture;
}

static void
add_drags (HlCanvas *self)
{
  GtkGesture *drag = add_gesture (self, gtk_gesture_drag_new (), GDK_BUTTON_PRIMARY);
  GtkGesture *pan = add_gesture (self, gtk_gesture_drag_new (), GDK_BUTTON_MIDDLE);
  GtkGesture *pinch = gtk_gesture_zoom_new ();
  gtk_event_controller_set_name (GTK_EVENT_CONTROLLER (drag), "primary-drag");    /* tests find it by this */
  g_signal_connect (drag, "drag-begin", G_CALLBACK (drag_begin_cb), self);
  g_signal_connect (drag, "drag-update", G_CALLBACK (drag_update_cb), self);
  g_signal_connect (drag, "drag-end", G_CALLBACK (drag_end_cb), self);
  g_signal_connect (drag, "cancel", G_CALLBACK (drag_cancel_cb), self);
  g_signal_connect (pan, "drag-begin", G_CALLBACK (pan_begin_cb), self);
  g_signal_connect (pan, "drag-update", G_CALLBACK (pan_update_cb), self);
  g_signal_connect (pan, "drag-end", G_CALLBACK (pan_end_cb), self);
  gtk_widget_add_controller (GTK_WIDGET (self), GTK_EVENT_CONTROLLER (pinch));
  g_signal_connect (pinch, "begin", G_CALLBACK (pinch_begin_cb), self);
  g_signal_connect (pinch, "scale-changed", G_CALLBACK (pinch_cb), self);
}

void
hl_canvas_add_gestures (HlCanvas *self)
{
  GtkEventController *scroll = gtk_event_controller_scroll_new (GTK_EVENT_CONTROLLER_SCROLL_BOTH_AXES);
  GtkEventController *motion = gtk_event_controller_motion_new (), *keys = gtk_event_controller_key_new ();

  add_drags (self);
  hl_canvas_add_drop_target (self);
  hl_canvas_add_menu (self);
  hl_canvas_add_quick_add (self);
  g_signal_connect (scroll, "scroll", G_CALLBACK (scroll_cb), self);
  gtk_widget_add_controller (GTK_WIDGET (self), scroll);
  g_signal_connect (motion, "motion", G_CALLBACK (motion_cb), self);
  g_signal_connect (motion, "enter", G_CALLBACK (motion_cb), self);
  g_signal_connect (motion, "leave", G_CALLBACK (leave_cb), self);
  gtk_widget_add_controller (GTK_WIDGET (self), motion);
  g_signal_connect (keys, "key-pressed", G_CALLBACK (key_pressed_cb), self);
  g_signal_connect (keys, "key-released", G_CALLBACK (key_released_cb), self);
  gtk_widget_add_controller (GTK_WIDGET (self), keys);
  gtk_widget_set_has_tooltip (GTK_WIDGET (self), TRUE);
  g_signal_connect (self, "query-tooltip", G_CALLBACK (query_tooltip_cb), self);
}
