/* The live state diagram: read-out under the pointer, a click selects the stream of a state, a drag moves the value behind it.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "app/hl-diagram-view.h"
#include "app/hl-appearance.h"
#include "app/hl-diagram-extras.h"
#include "app/hl-diagram-ghost.h"
#include "app/hl-lever.h"
#include "app/hl-pane.h"
#include "app/hl-trace.h"
#include "draw/state-diagram.h"
#include "plant/i18n.h"

#include <math.h>

#define HIT_RADIUS 12.0
#define DRAG_THRESHOLD 8.0

struct _HlDiagramView {
  GtkWidget       parent_instance;
  HlSession      *session;
  GtkWidget      *readout, *empty, *chooser, *extras;
  HlStateDiagramKind kind;
  HlStateDiagram *diagram;          /* of shown, at the size below; NULL: to be made */
  HlSolution     *shown;
  int             width, height;
  GskRenderNode  *node;             /* the diagram drawn; NULL: to be drawn */
  const HlTheme  *theme;            /* with which node was drawn */
  int             selected;         /* stream ringed in node */
  gboolean        has_pointer;
  double          x, y;             /* of the pointer */
  GArray         *levers;           /* of HlLever: what a drag of the state under the pointer would change; NULL: not asked yet */
  int             levers_of;        /* stream */
  int             grabbed;          /* stream whose state is pressed on, or -1 */
  HlLeverDrag    *drag;
  HlStateDiagram *ghost;            /* before the drag; the present one stays on its axes */
  HlDiagramGhost *other;            /* another variant beneath */
  HlStateDiagram *beneath;          /* its diagram, on the axes of the present one; NULL: to be made, or none */
  gboolean        is_drag_over;     /* given up, though the button is still down */
};

G_DEFINE_FINAL_TYPE (HlDiagramView, hl_diagram_view, GTK_TYPE_WIDGET)

/* --- what is shown --- */

static gboolean
is_stale (HlDiagramView *self)
{
  HlSolution *present = hl_session_solution (self->session);
  return !hl_solution_is_solved (present) && !hl_solution_is_partial (present);
}

/* The present solution; where it failed the last good one, or what was found of it, drawn grey. */
static HlSolution *
solution_to_show (HlDiagramView *self)
{
  HlSolution *good = hl_session_last_good (self->session);
  return is_stale (self) && good != NULL ? good : hl_session_solution (self->session);
}

static HlPlant *
shown_plant (HlDiagramView *self)
{
  return hl_solution_plant (self->shown);
}

static gboolean
has_states (const HlSolution *solution)
{
  HlStreamResult result;

  for (guint n = 0; n < hl_plant_n_streams (hl_solution_plant (solution)); n++)
    {
      hl_solution_stream (solution, n, &result);
      if (result.has_state)
        return TRUE;
    }
  return FALSE;
}

static int
selected_stream (HlDiagramView *self)
{
  guint n;
  const char *const *ids = hl_session_selection (self->session, &n);
  return n == 1 ? hl_plant_stream_index (shown_plant (self), ids[0]) : -1;
}

static void
forget_drawing (HlDiagramView *self)
{
  g_clear_pointer (&self->node, gsk_render_node_unref);
}

static void
forget_diagram (HlDiagramView *self)
{
  g_clear_pointer (&self->diagram, hl_state_diagram_free);
  g_clear_pointer (&self->beneath, hl_state_diagram_free);
  forget_drawing (self);
}

static void
forget_levers (HlDiagramView *self)
{
  g_clear_pointer (&self->levers, g_array_unref);
}

static const GArray *
levers_of (HlDiagramView *self, int stream)
{
  if (self->levers == NULL || self->levers_of != stream)
    {
      forget_levers (self);
      self->levers = hl_levers_new (self->shown, (guint) stream);
      self->levers_of = stream;
    }
  return self->levers;
}

static void
describe (HlDiagramView *self)
{
  HlUnitSet units = hl_plant_units (shown_plant (self));
  HlDimension across, up;
  GString *text = g_string_new (NULL);
  HlStreamResult result;

  hl_state_diagram_dimensions (self->kind, &across, &up);
  for (guint n = 0; n < hl_plant_n_streams (shown_plant (self)); n++)
    {
      hl_solution_stream (self->shown, n, &result);
      if (!result.has_state)
        continue;
      g_autofree char *T = hl_units_format (up == HL_DIMENSION_TEMPERATURE ? result.state.T : up == HL_DIMENSION_ENTHALPY ? result.state.h : result.state.p, up, units);
      g_autofree char *s = hl_units_format (across == HL_DIMENSION_ENTROPY ? result.state.s : result.state.h, across, units);
      g_string_append_printf (text, "%s%s: %s, %s", text->len > 0 ? "; " : "", hl_plant_stream (shown_plant (self), n)->id, T, s);
    }
  hl_pane_set_accessible (GTK_WIDGET (self), hl_state_diagram_title (self->kind), text->str);
  g_string_free (text, TRUE);
}

static void
show_empty (HlDiagramView *self)
{
  gtk_widget_set_visible (self->empty, !has_states (self->shown));
}

/* --- the read-out --- */

/* "↕ steam temperature of B1 · ↔ inlet pressure of T1": what a drag up or down, and one sideways, would change. */
static char *
levers_text (HlDiagramView *self, int stream)
{
  const HlPlant *plant = shown_plant (self);
  const GArray *levers = levers_of (self, stream);
  const HlLever *up = hl_levers_along (levers, self->diagram, self->kind, 0.0, 1.0);
  const HlLever *across = hl_levers_along (levers, self->diagram, self->kind, 1.0, 0.0);

  if (is_stale (self))
    return g_strdup ("");
  if (up == NULL && across == NULL)
    return g_strdup (_("\nNothing given nearby moves this state"));
  if (up == NULL || across == NULL || up == across)
    {
      g_autofree char *what = hl_plant_describe (plant, &(up != NULL ? up : across)->address);
      return g_strdup_printf (_("\nDrag: %s"), what);
    }
  g_autofree char *first = hl_plant_describe (plant, &up->address), *second = hl_plant_describe (plant, &across->address);
  /* Translators: what dragging a state up or down, and sideways, changes: "↕ steam temperature of B1 · ↔ inlet pressure of T1" */
  return g_strdup_printf (_("\nDrag: ↕ %s · ↔ %s"), first, second);
}

static char *
state_text (HlDiagramView *self, int stream)
{
  HlUnitSet units = hl_plant_units (shown_plant (self));
  HlStreamResult result;

  hl_solution_stream (self->shown, (guint) stream, &result);
  gboolean is_wet = result.state.phase == HL_PHASE_TWO_PHASE;
  g_autofree char *p = hl_units_format (result.state.p, HL_DIMENSION_PRESSURE, units);
  g_autofree char *t = hl_units_format (result.state.T, HL_DIMENSION_TEMPERATURE, units);
  g_autofree char *h = hl_units_format (result.state.h, HL_DIMENSION_ENTHALPY, units);
  g_autofree char *x = is_wet ? hl_units_format_number (result.state.x, HL_DIMENSION_RATIO, units) : NULL;
  g_autofree char *wet = is_wet ? g_strdup_printf (" · x %s", x) : g_strdup ("");
  return g_strdup_printf ("%s   %s · %s%s · %s", hl_plant_stream (shown_plant (self), (guint) stream)->id, p, t, wet, h);
}

/* While dragging: the value that moves, from where to where.  Beside a state: its stream in full, and what a drag would change.
 * Elsewhere: what the axes say under the pointer. */
static char *
readout_text (HlDiagramView *self)
{
  HlUnitSet units = hl_plant_units (shown_plant (self));
  double across, up;
  HlDimension dimension_across, dimension_up;
  int stream = self->drag != NULL ? self->grabbed : hl_state_diagram_stream_at (self->diagram, self->x, self->y, HIT_RADIUS);

  if (stream >= 0 && stream < (int) hl_plant_n_streams (shown_plant (self)))
    {
      g_autofree char *state = state_text (self, stream);
      g_autofree char *value = self->drag != NULL ? hl_lever_drag_text (self->drag) : NULL;
      g_autofree char *levers = self->drag == NULL ? levers_text (self, stream) : NULL;
      return self->drag != NULL ? g_strdup_printf ("%s\n%s", value, state) : g_strconcat (state, levers, NULL);
    }
  if (!hl_state_diagram_to_state (self->diagram, self->x, self->y, &across, &up))
    return NULL;
  hl_state_diagram_dimensions (self->kind, &dimension_across, &dimension_up);
  g_autofree char *first = hl_units_format (up, dimension_up, units);
  g_autofree char *second = hl_units_format (across, dimension_across, units);
  return g_strdup_printf ("%s · %s", first, second);
}

static void
update_readout (HlDiagramView *self)
{
  g_autofree char *text = (self->has_pointer || self->drag != NULL) && self->diagram != NULL ? readout_text (self) : NULL;

  gtk_label_set_text (GTK_LABEL (self->readout), text != NULL ? text : "");
  gtk_widget_set_visible (self->readout, text != NULL);
  gtk_widget_set_cursor_from_name (GTK_WIDGET (self), self->diagram != NULL && text != NULL
                                   && hl_state_diagram_stream_at (self->diagram, self->x, self->y, HIT_RADIUS) >= 0 ? "pointer" : NULL);
  gtk_widget_queue_allocate (GTK_WIDGET (self));
  gtk_widget_queue_draw (GTK_WIDGET (self));
}

/* --- drawing --- */

/* Where the states are, for whoever drives the program from outside. */
static void
trace_places (HlDiagramView *self)
{
  HlDimension across, up;

  hl_state_diagram_dimensions (self->kind, &across, &up);
  for (guint n = 0; hl_trace_is_on () && n < hl_plant_n_streams (shown_plant (self)); n++)
    {
      HlStreamResult result;
      double x, y;
      hl_solution_stream (self->shown, n, &result);
      if (!result.has_state)
        continue;
      hl_state_diagram_to_pixel (self->diagram, across == HL_DIMENSION_ENTROPY ? result.state.s : result.state.h,
                                 up == HL_DIMENSION_TEMPERATURE ? result.state.T : up == HL_DIMENSION_ENTHALPY ? result.state.h : result.state.p, &x, &y);
      hl_trace_place ("state", hl_plant_stream (shown_plant (self), n)->id, GTK_WIDGET (self), x, y);
    }
}

static void
make_diagram (HlDiagramView *self)
{
  int width = gtk_widget_get_width (GTK_WIDGET (self)), height = gtk_widget_get_height (GTK_WIDGET (self));

  if (self->diagram != NULL && width == self->width && height == self->height)
    return;
  forget_diagram (self);
  self->width = width;
  self->height = height;
  if (self->ghost != NULL)
    self->diagram = hl_state_diagram_new_on (self->shown, self->ghost);
  else
    self->diagram = hl_state_diagram_new_with (self->shown, self->kind, hl_diagram_extras_button_flags (self->extras), hl_plant_units (shown_plant (self)),
                                               width, height);
  if (hl_diagram_ghost_solution (self->other) != NULL)
    self->beneath = hl_state_diagram_new_on (hl_diagram_ghost_solution (self->other), self->diagram);
  trace_places (self);
}

/* The same node as long as nothing changes: only the crosshair is then drawn anew. */
static void
draw_diagram (HlDiagramView *self)
{
  const HlTheme *theme = hl_appearance_theme ();
  int selected = selected_stream (self);

  if (self->node != NULL && self->theme == theme && self->selected == selected)
    return;
  forget_drawing (self);
  self->theme = theme;
  self->selected = selected;
  self->node = gsk_cairo_node_new (&GRAPHENE_RECT_INIT (0, 0, self->width, self->height));
  cairo_t *cr = gsk_cairo_node_get_draw_context (self->node);
  hl_state_diagram_draw_over (self->diagram, self->ghost != NULL ? self->ghost : self->beneath, cr, theme, is_stale (self), selected);
  cairo_destroy (cr);
}

static void
draw_crosshair (HlDiagramView *self, GtkSnapshot *snapshot)
{
  const HlColour *quiet = &hl_appearance_theme ()->quiet;
  GdkRGBA colour = { (float) quiet->r, (float) quiet->g, (float) quiet->b, 0.45f };
  double s, T;

  if (!self->has_pointer || !hl_state_diagram_to_state (self->diagram, self->x, self->y, &s, &T))
    return;
  gtk_snapshot_append_color (snapshot, &colour, &GRAPHENE_RECT_INIT (floor (self->x), 0, 1, self->height));
  gtk_snapshot_append_color (snapshot, &colour, &GRAPHENE_RECT_INIT (0, floor (self->y), self->width, 1));
}

static void
hl_diagram_view_snapshot (GtkWidget *widget, GtkSnapshot *snapshot)
{
  HlDiagramView *self = HL_DIAGRAM_VIEW (widget);

  if (gtk_widget_get_width (widget) < 40 || gtk_widget_get_height (widget) < 40)
    return;
  if (!gtk_widget_get_visible (self->empty))
    {
      make_diagram (self);
      draw_diagram (self);
      gtk_snapshot_append_node (snapshot, self->node);
      draw_crosshair (self, snapshot);
    }
  for (GtkWidget *child = gtk_widget_get_first_child (widget); child != NULL; child = gtk_widget_get_next_sibling (child))
    gtk_widget_snapshot_child (widget, child, snapshot);
}

/* --- changes --- */

/* Another ghost, or none. */
static void
ghost_cb (gpointer data)
{
  HlDiagramView *self = data;
  forget_diagram (self);
  gtk_widget_queue_allocate (GTK_WIDGET (self));
  gtk_widget_queue_draw (GTK_WIDGET (self));
}

static void
changed_cb (HlDiagramView *self)
{
  HlSolution *solution = solution_to_show (self);
  hl_diagram_ghost_update (self->other);

  if (solution != self->shown)
    {
      hl_solution_ref (solution);
      g_clear_pointer (&self->shown, hl_solution_unref);
      self->shown = solution;
      forget_levers (self);
      forget_diagram (self);
      show_empty (self);
      describe (self);
    }
  else
    forget_drawing (self);            /* it may have become stale */
  if (self->has_pointer && gtk_widget_get_mapped (GTK_WIDGET (self)) && !gtk_widget_get_visible (self->empty))
    {
      make_diagram (self);
      update_readout (self);
    }
  gtk_widget_queue_draw (GTK_WIDGET (self));
}

/* --- dragging a state --- */

/* Whatever became of it: the diagram is fitted to its own axes again. */
static void
end_drag (HlDiagramView *self, gboolean keep)
{
  HlLeverDrag *drag = g_steal_pointer (&self->drag);

  self->grabbed = -1;
  self->is_drag_over = TRUE;
  if (drag == NULL)
    return;
  if (keep)
    hl_lever_drag_finish (drag);
  else
    hl_lever_drag_cancel (drag);
  g_clear_pointer (&self->ghost, hl_state_diagram_free);
  forget_diagram (self);
  gtk_widget_set_cursor (GTK_WIDGET (self), NULL);
  make_diagram (self);
  update_readout (self);
}

static void
drag_begin_cb (GtkGestureDrag *gesture, double x, double y, HlDiagramView *self)
{
  self->grabbed = self->diagram != NULL && !is_stale (self) ? hl_state_diagram_stream_at (self->diagram, x, y, HIT_RADIUS) : -1;
  self->is_drag_over = self->grabbed < 0;
  if (self->is_drag_over)
    gtk_gesture_set_state (GTK_GESTURE (gesture), GTK_EVENT_SEQUENCE_DENIED);
}

/* The first pixels say which way it goes, and so which value. */
static gboolean
start_drag (HlDiagramView *self, double dx, double dy)
{
  const HlLever *lever = hl_levers_along (levers_of (self, self->grabbed), self->diagram, self->kind, dx, dy);

  if (lever == NULL)
    {
      g_signal_emit_by_name (self->session, "message", _("Nothing given nearby moves this state that way"));
      return FALSE;
    }
  self->drag = hl_lever_drag_begin (self->session, lever, hl_plant_stream (shown_plant (self), (guint) self->grabbed)->id, self->diagram, self->kind);
  if (self->drag == NULL)
    return FALSE;
  self->ghost = g_steal_pointer (&self->diagram);
  gtk_widget_set_cursor_from_name (GTK_WIDGET (self), "grabbing");
  return TRUE;
}

static void
drag_update_cb (GtkGestureDrag *gesture, double dx, double dy, HlDiagramView *self)
{
  if (self->is_drag_over)
    return;
  if (self->drag == NULL)
    {
      if (hypot (dx, dy) < DRAG_THRESHOLD)
        return;
      if (!start_drag (self, dx, dy))
        {
          self->is_drag_over = TRUE;
          return;
        }
      gtk_gesture_set_state (GTK_GESTURE (gesture), GTK_EVENT_SEQUENCE_CLAIMED);
    }
  hl_lever_drag_to (self->drag, dx, dy);
  make_diagram (self);
  update_readout (self);
}

static void
drag_end_cb (GtkGestureDrag *gesture, double dx, double dy, HlDiagramView *self)
{
  end_drag (self, TRUE);
}

static void
drag_cancel_cb (GtkGesture *gesture, GdkEventSequence *sequence, HlDiagramView *self)
{
  end_drag (self, FALSE);
}

static gboolean
key_pressed_cb (GtkEventControllerKey *controller, guint key, guint code, GdkModifierType state, HlDiagramView *self)
{
  if (key != GDK_KEY_Escape || self->drag == NULL)
    return GDK_EVENT_PROPAGATE;
  end_drag (self, FALSE);
  return GDK_EVENT_STOP;
}

static void
motion_cb (GtkEventControllerMotion *controller, double x, double y, HlDiagramView *self)
{
  self->has_pointer = TRUE;
  self->x = x;
  self->y = y;
  update_readout (self);
}

static void
leave_cb (GtkEventControllerMotion *controller, HlDiagramView *self)
{
  self->has_pointer = FALSE;
  update_readout (self);
}

static void
pressed_cb (GtkGestureClick *gesture, int n_press, double x, double y, HlDiagramView *self)
{
  if (gtk_widget_pick (GTK_WIDGET (self), x, y, GTK_PICK_DEFAULT) != GTK_WIDGET (self))
    return;                           /* on a chooser */
  gtk_widget_grab_focus (GTK_WIDGET (self));
  if (self->diagram == NULL)
    return;
  int stream = hl_state_diagram_stream_at (self->diagram, x, y, HIT_RADIUS);
  hl_session_select (self->session, stream >= 0 ? hl_plant_stream (shown_plant (self), (guint) stream)->id : NULL, FALSE);
}

/* Left and right step through the states in the order of the streams. */
static gboolean
step_cb (GtkWidget *widget, GVariant *args, gpointer data)
{
  HlDiagramView *self = HL_DIAGRAM_VIEW (widget);
  const HlPlant *plant = shown_plant (self);
  int n = (int) hl_plant_n_streams (plant), step = g_variant_get_int32 (args), at = selected_stream (self);

  for (int tried = 0; tried < n; tried++)
    {
      HlStreamResult result;
      at = at < 0 && step < 0 ? n - 1 : (at + step + n) % n;
      hl_solution_stream (self->shown, (guint) at, &result);
      if (!result.has_state)
        continue;
      hl_session_select (self->session, hl_plant_stream (plant, (guint) at)->id, FALSE);
      break;
    }
  return TRUE;
}

/* --- life --- */

static void
hl_diagram_view_measure (GtkWidget *widget, GtkOrientation orientation, int for_size, int *minimum, int *natural, int *min_base, int *nat_base)
{
  *minimum = orientation == GTK_ORIENTATION_HORIZONTAL ? 260 : 170;
  *natural = orientation == GTK_ORIENTATION_HORIZONTAL ? 560 : 280;
}

static void
place (GtkWidget *child, int x, int y)
{
  GtkRequisition size;

  if (!gtk_widget_should_layout (child))
    return;
  gtk_widget_get_preferred_size (child, NULL, &size);
  gtk_widget_size_allocate (child, &(GtkAllocation) { x, y, size.width, size.height }, -1);
}

/* Cold and hot at once: no state lies at the upper left.  A long read-out reaches further, and gives way to the pointer. */
static void
place_readout (HlDiagramView *self, int x, const GtkRequisition *size, int height)
{
  int y = 8, margin = 22;

  if (self->has_pointer && self->x > x - margin && self->x < x + size->width + margin && self->y < y + size->height + margin)
    y = MIN ((int) self->y + margin, MAX (y, height - size->height));
  place (self->readout, x, y);
}

static void
hl_diagram_view_allocate (GtkWidget *widget, int width, int height, int baseline)
{
  HlDiagramView *self = HL_DIAGRAM_VIEW (widget);
  GtkRequisition size;
  int left = 56;

  gtk_widget_get_preferred_size (self->chooser, NULL, &size);
  place (self->chooser, 56, 8);
  left += size.width + 8;
  gtk_widget_get_preferred_size (self->extras, NULL, &size);
  place (self->extras, left, 8);
  left += size.width + 8;
  if (gtk_widget_should_layout (hl_diagram_ghost_chooser (self->other)))
    {
      gtk_widget_get_preferred_size (hl_diagram_ghost_chooser (self->other), NULL, &size);
      place (hl_diagram_ghost_chooser (self->other), left, 8);
      left += size.width + 8;
    }
  gtk_widget_get_preferred_size (self->readout, NULL, &size);
  place_readout (self, MIN (left, MAX (0, width - size.width)), &size, height);
  gtk_widget_get_preferred_size (self->empty, NULL, &size);
  place (self->empty, MAX (0, (width - size.width) / 2), MAX (0, (height - size.height) / 2));
}

static void
hl_diagram_view_dispose (GObject *object)
{
  HlDiagramView *self = HL_DIAGRAM_VIEW (object);
  GtkWidget *child;

  if (self->session != NULL)
    g_signal_handlers_disconnect_by_data (self->session, self);
  while ((child = gtk_widget_get_first_child (GTK_WIDGET (self))) != NULL)
    gtk_widget_unparent (child);
  forget_diagram (self);
  g_clear_pointer (&self->other, hl_diagram_ghost_free);
  forget_levers (self);
  if (self->drag != NULL)
    hl_lever_drag_cancel (g_steal_pointer (&self->drag));
  g_clear_pointer (&self->ghost, hl_state_diagram_free);
  g_clear_pointer (&self->shown, hl_solution_unref);
  g_clear_object (&self->session);
  G_OBJECT_CLASS (hl_diagram_view_parent_class)->dispose (object);
}

static void
hl_diagram_view_class_init (HlDiagramViewClass *klass)
{
  GtkWidgetClass *widget_class = GTK_WIDGET_CLASS (klass);
  G_OBJECT_CLASS (klass)->dispose = hl_diagram_view_dispose;
  widget_class->snapshot = hl_diagram_view_snapshot;
  widget_class->measure = hl_diagram_view_measure;
  widget_class->size_allocate = hl_diagram_view_allocate;
  gtk_widget_class_add_binding (widget_class, GDK_KEY_Right, 0, step_cb, "i", 1);
  gtk_widget_class_add_binding (widget_class, GDK_KEY_Left, 0, step_cb, "i", -1);
  gtk_widget_class_set_css_name (widget_class, "diagramview");
  gtk_widget_class_set_accessible_role (widget_class, GTK_ACCESSIBLE_ROLE_IMG);
}

static void
chosen_cb (HlDiagramView *self)
{
  end_drag (self, FALSE);
  self->kind = (HlStateDiagramKind) gtk_drop_down_get_selected (GTK_DROP_DOWN (self->chooser));
  forget_diagram (self);
  if (self->shown != NULL)
    describe (self);
  gtk_widget_queue_draw (GTK_WIDGET (self));
}

static void
extras_changed_cb (gpointer data)
{
  HlDiagramView *self = data;
  forget_diagram (self);
  gtk_widget_queue_draw (GTK_WIDGET (self));
}

static GtkWidget *
build_chooser (HlDiagramView *self)
{
  GtkStringList *signs = gtk_string_list_new (NULL);
  GtkWidget *chooser;

  for (int kind = 0; kind < HL_N_STATE_DIAGRAMS; kind++)
    gtk_string_list_append (signs, hl_state_diagram_sign ((HlStateDiagramKind) kind));
  chooser = gtk_drop_down_new (G_LIST_MODEL (signs), NULL);
  hl_pane_set_accessible (chooser, _("Kind of state diagram"), NULL);
  gtk_widget_set_tooltip_text (chooser, _("Kind of state diagram"));
  g_signal_connect_swapped (chooser, "notify::selected", G_CALLBACK (chosen_cb), self);
  return chooser;
}

static void
hl_diagram_view_init (HlDiagramView *self)
{
  GtkEventController *motion = gtk_event_controller_motion_new ();
  GtkEventController *keys = gtk_event_controller_key_new ();
  GtkGesture *click = gtk_gesture_click_new (), *drag = gtk_gesture_drag_new ();

  self->grabbed = -1;
  gtk_widget_set_focusable (GTK_WIDGET (self), TRUE);
  gtk_widget_set_overflow (GTK_WIDGET (self), GTK_OVERFLOW_HIDDEN);
  self->selected = -1;
  self->readout = hl_pane_label ("", "readout");
  gtk_label_set_wrap (GTK_LABEL (self->readout), TRUE);
  gtk_label_set_max_width_chars (GTK_LABEL (self->readout), 72);
  gtk_widget_set_can_target (self->readout, FALSE);
  gtk_widget_set_visible (self->readout, FALSE);
  gtk_widget_set_parent (self->readout, GTK_WIDGET (self));
  self->chooser = build_chooser (self);
  gtk_widget_set_parent (self->chooser, GTK_WIDGET (self));
  self->extras = hl_diagram_extras_button_new (extras_changed_cb, self);
  gtk_widget_set_parent (self->extras, GTK_WIDGET (self));
  self->empty = hl_pane_label (_("States appear here as soon as the plant solves."), "quiet");
  gtk_widget_set_parent (self->empty, GTK_WIDGET (self));
  g_signal_connect (motion, "enter", G_CALLBACK (motion_cb), self);
  g_signal_connect (motion, "motion", G_CALLBACK (motion_cb), self);
  g_signal_connect (motion, "leave", G_CALLBACK (leave_cb), self);
  gtk_widget_add_controller (GTK_WIDGET (self), motion);
  g_signal_connect (click, "pressed", G_CALLBACK (pressed_cb), self);
  gtk_widget_add_controller (GTK_WIDGET (self), GTK_EVENT_CONTROLLER (click));
  g_signal_connect (drag, "drag-begin", G_CALLBACK (drag_begin_cb), self);
  g_signal_connect (drag, "drag-update", G_CALLBACK (drag_update_cb), self);
  g_signal_connect (drag, "drag-end", G_CALLBACK (drag_end_cb), self);
  g_signal_connect (drag, "cancel", G_CALLBACK (drag_cancel_cb), self);
  gtk_widget_add_controller (GTK_WIDGET (self), GTK_EVENT_CONTROLLER (drag));
  gtk_event_controller_set_propagation_phase (keys, GTK_PHASE_CAPTURE);
  g_signal_connect (keys, "key-pressed", G_CALLBACK (key_pressed_cb), self);
  gtk_widget_add_controller (GTK_WIDGET (self), keys);
}

GtkWidget *
hl_diagram_view_new (HlSession *session)
{
  HlDiagramView *self = g_object_new (HL_TYPE_DIAGRAM_VIEW, NULL);

  self->session = g_object_ref (session);
  self->other = hl_diagram_ghost_new (session, ghost_cb, self);
  gtk_widget_set_parent (hl_diagram_ghost_chooser (self->other), GTK_WIDGET (self));
  g_signal_connect_swapped (session, "changed", G_CALLBACK (changed_cb), self);
  g_signal_connect_swapped (session, "selection-changed", G_CALLBACK (gtk_widget_queue_draw), self);
  changed_cb (self);
  return GTK_WIDGET (self);
}

void
hl_diagram_view_set_ghost (HlDiagramView *self, const char *variant)
{
  g_return_if_fail (HL_IS_DIAGRAM_VIEW (self));
  hl_diagram_ghost_choose (self->other, variant);
}

void
hl_diagram_view_set_kind (HlDiagramView *self, HlStateDiagramKind kind)
{
  g_return_if_fail (HL_IS_DIAGRAM_VIEW (self) && kind < HL_N_STATE_DIAGRAMS);
  gtk_drop_down_set_selected (GTK_DROP_DOWN (self->chooser), kind);
}
