/* A value changed without typing: Ctrl with the arrow keys, or a drag sideways on its name or unit.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "app/hl-quantity-row-private.h"
#include "plant/i18n.h"

#include <math.h>

#define DRAG_THRESHOLD 6.0
#define PIXELS_A_STEP  6.0

gboolean
hl_quantity_row_can_scrub (HlQuantityRow *self)
{
  return hl_scrub_value_at (hl_session_plant (self->session), &self->address, NULL) != NULL;
}

/* Ended before the last motion has been answered, or broken off by Escape: once only. */
static void
end_drag (HlQuantityRow *self, gboolean keep)
{
  gtk_widget_remove_css_class (GTK_WIDGET (self), "scrubbed");
  self->is_drag_over = TRUE;
  if (self->scrub == NULL)
    return;
  g_object_ref (self);
  if (keep)
    hl_scrub_finish (g_steal_pointer (&self->scrub));
  else
    hl_scrub_cancel (g_steal_pointer (&self->scrub));
  g_object_unref (self);
}

/* --- keys --- */

static void
step_by_key (HlQuantityRow *self, int steps, gboolean is_fine)
{
  g_autoptr (GError) error = NULL;

  g_object_ref (self);
  if (hl_scrub_by_keys (self->session, &self->address, steps, is_fine, &error))
    hl_quantity_row_set_note (self, NULL, FALSE);
  else if (!self->is_retired)
    hl_quantity_row_set_note (self, error->message, FALSE);
  g_object_unref (self);
}

static gboolean
key_pressed_cb (GtkEventControllerKey *controller, guint key, guint code, GdkModifierType state, HlQuantityRow *self)
{
  gboolean is_up = key == GDK_KEY_Up || key == GDK_KEY_KP_Up, is_down = key == GDK_KEY_Down || key == GDK_KEY_KP_Down;

  if (key == GDK_KEY_Escape && self->scrub != NULL)
    {
      end_drag (self, FALSE);
      return GDK_EVENT_STOP;
    }
  if (!(is_up || is_down) || !(state & GDK_CONTROL_MASK))
    return GDK_EVENT_PROPAGATE;
  if (!hl_quantity_row_commit (self))
    return GDK_EVENT_STOP;               /* what has been typed cannot be read: it comes first */
  step_by_key (self, is_up ? 1 : -1, (state & GDK_SHIFT_MASK) != 0);
  return GDK_EVENT_STOP;
}

/* --- dragging --- */

static void
drag_begin_cb (GtkGestureDrag *gesture, double x, double y, HlQuantityRow *self)
{
  GtkWidget *under = gtk_widget_pick (self->line, x, y, GTK_PICK_DEFAULT);
  gboolean is_handle = under != NULL && (under == self->unit || under == self->name_button
                                         || gtk_widget_is_ancestor (under, self->name_button));

  self->drag_amount = 0.0;
  self->drag_x = 0.0;
  self->is_drag_over = !is_handle || !hl_quantity_row_can_scrub (self) || hl_quantity_row_is_typing (self);
  if (self->is_drag_over)
    gtk_gesture_set_state (GTK_GESTURE (gesture), GTK_EVENT_SEQUENCE_DENIED);
}

static void
drag_update_cb (GtkGestureDrag *gesture, double dx, double dy, HlQuantityRow *self)
{
  const HlPlant *plant = hl_session_plant (self->session);
  gboolean is_fine = (gtk_event_controller_get_current_event_state (GTK_EVENT_CONTROLLER (gesture)) & GDK_SHIFT_MASK) != 0;

  if (self->is_drag_over)
    return;
  if (self->scrub == NULL)
    {
      if (fabs (dx) < DRAG_THRESHOLD || (self->scrub = hl_scrub_begin (self->session, &self->address)) == NULL)
        return;
      self->drag_x = dx > 0.0 ? DRAG_THRESHOLD : -DRAG_THRESHOLD;
      gtk_gesture_set_state (GTK_GESTURE (gesture), GTK_EVENT_SEQUENCE_CLAIMED);     /* no click on the name */
      gtk_widget_add_css_class (GTK_WIDGET (self), "scrubbed");
    }
  double start = hl_scrub_start (self->scrub);
  double step = hl_scrub_step (self->kind, start, hl_plant_units (plant), FALSE);
  double fine = hl_scrub_step (self->kind, start, hl_plant_units (plant), TRUE);
  self->drag_amount += (dx - self->drag_x) / PIXELS_A_STEP * (is_fine ? fine : step);
  self->drag_x = dx;
  hl_scrub_to (self->scrub, hl_scrub_moved (plant, self->kind, start, self->drag_amount, is_fine ? fine : step));
}

static void
drag_end_cb (GtkGestureDrag *gesture, double dx, double dy, HlQuantityRow *self)
{
  end_drag (self, TRUE);
}

static void
drag_cancel_cb (GtkGesture *gesture, GdkEventSequence *sequence, HlQuantityRow *self)
{
  end_drag (self, FALSE);
}

void
hl_quantity_row_add_scrub (HlQuantityRow *self)
{
  GtkEventController *keys = gtk_event_controller_key_new ();
  GtkGesture *drag = gtk_gesture_drag_new ();

  gtk_event_controller_set_propagation_phase (keys, GTK_PHASE_CAPTURE);
  g_signal_connect (keys, "key-pressed", G_CALLBACK (key_pressed_cb), self);
  gtk_widget_add_controller (GTK_WIDGET (self), keys);
  /* Before the button of the name, which would take the press for itself. */
  gtk_event_controller_set_propagation_phase (GTK_EVENT_CONTROLLER (drag), GTK_PHASE_CAPTURE);
  g_signal_connect (drag, "drag-begin", G_CALLBACK (drag_begin_cb), self);
  g_signal_connect (drag, "drag-update", G_CALLBACK (drag_update_cb), self);
  g_signal_connect (drag, "drag-end", G_CALLBACK (drag_end_cb), self);
  g_signal_connect (drag, "cancel", G_CALLBACK (drag_cancel_cb), self);
  gtk_widget_add_controller (self->line, GTK_EVENT_CONTROLLER (drag));
}

/* The pointer says where a drag changes something. */
void
hl_quantity_row_update_scrub (HlQuantityRow *self)
{
  const char *cursor = hl_quantity_row_can_scrub (self) ? "ew-resize" : NULL;

  gtk_widget_set_cursor_from_name (self->unit, cursor);
}
