/* The drawing surface: follows the session, places its children, zooms and pans.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "app/hl-canvas-private.h"
#include "app/hl-appearance.h"
#include "app/hl-trace.h"
#include "plant/i18n.h"

#define LEAST_ZOOM 0.2
#define MOST_ZOOM 4.0
#define FIT_ZOOM 1.35      /* a small plant is not blown up further than this */
#define FIT_MARGIN 6.0      /* beside the margin of the drawing's own extents */

enum { PROP_ZOOM = 1, N_PROPERTIES };
static GParamSpec *properties[N_PROPERTIES];

G_DEFINE_FINAL_TYPE (HlCanvas, hl_canvas, GTK_TYPE_WIDGET)

/* Places */

void
hl_canvas_to_canvas (HlCanvas *self, double vx, double vy, double *x, double *y)
{
  *x = (vx - self->ox) / self->zoom;
  *y = (vy - self->oy) / self->zoom;
}

void
hl_canvas_to_view (HlCanvas *self, double x, double y, double *vx, double *vy)
{
  *vx = self->ox + self->zoom * x;
  *vy = self->oy + self->zoom * y;
}

void
hl_canvas_to_grid (HlCanvas *self, double vx, double vy, int *gx, int *gy)
{
  double x, y;
  hl_canvas_to_canvas (self, vx, vy, &x, &y);
  *gx = (int) floor (x / HL_UNIT + 0.5);
  *gy = (int) floor (y / HL_UNIT + 0.5);
}

HlPlant *
hl_canvas_plant (HlCanvas *self)
{
  return hl_session_plant (self->session);
}

HlComponentItem *
hl_canvas_item (HlCanvas *self, const char *id)
{
  return id != NULL ? g_hash_table_lookup (self->items, id) : NULL;
}

/* The one under the pointer; where boxes overlap, the later one, which is drawn on top. */
const char *
hl_canvas_component_at (HlCanvas *self, double vx, double vy)
{
  HlPlant *plant = hl_canvas_plant (self);
  double x, y;
  hl_canvas_to_canvas (self, vx, vy, &x, &y);
  for (guint n = hl_plant_n_components (plant); n-- > 0; )
    {
      const HlComponent *component = hl_plant_component (plant, n);
      int hw, hh;
      hl_component_half_size (component, &hw, &hh);
      if (fabs (x - component->x * HL_UNIT) <= hw * HL_UNIT + 3 && fabs (y - component->y * HL_UNIT) <= hh * HL_UNIT + 3)
        return component->id;
    }
  return NULL;
}

gboolean
hl_canvas_locate (HlCanvas *self, const char *id, const char *port, double *vx, double *vy)
{
  const HlComponent *component = hl_plant_find_component (hl_canvas_plant (self), id);
  HlPortRef ref = { id, port };
  double x, y;
  if (component == NULL)
    return FALSE;
  if (port == NULL)
    {
      x = component->x * HL_UNIT;
      y = component->y * HL_UNIT;
    }
  else if (!hl_canvas_port_point (self, &ref, &x, &y))
    return FALSE;
  hl_canvas_to_view (self, x, y, vx, vy);
  return TRUE;
}

/* Following the session */

/* While the present plant does not solve, the figures of the last good solution stay, greyed, where they still belong to it; what the
 * present one knows already while it is being drawn needs no such help. */
static gboolean
is_of_same_shape (const HlPlant *a, const HlPlant *b)
{
  if (hl_plant_n_streams (a) != hl_plant_n_streams (b) || hl_plant_n_components (a) != hl_plant_n_components (b))
    return FALSE;
  for (guint n = 0; n < hl_plant_n_streams (a); n++)
    if (hl_plant_stream (a, n)->id != hl_plant_stream (b, n)->id)
      return FALSE;
  for (guint n = 0; n < hl_plant_n_components (a); n++)
    if (hl_plant_component (a, n)->id != hl_plant_component (b, n)->id)
      return FALSE;
  return TRUE;
}

static void
choose_shown_solution (HlCanvas *self)
{
  HlSolution *present = hl_session_solution (self->session), *good = hl_session_last_good (self->session);
  HlSolution *shown = present;
  self->is_stale = !hl_solution_is_solved (present);
  if (self->is_stale && !hl_solution_is_partial (present) && good != NULL && is_of_same_shape (hl_canvas_plant (self), hl_solution_plant (good)))
    shown = good;
  shown = hl_solution_ref (shown);
  g_clear_pointer (&self->shown, hl_solution_unref);
  self->shown = shown;
}

static gboolean
has_gone (gpointer id, gpointer item, gpointer plant)
{
  return hl_plant_find_component (plant, id) == NULL;
}

static void
item_unparent (gpointer item)
{
  gtk_widget_unparent (item);
}

static gboolean
focus_enter_cb (GtkEventControllerFocus *controller, gpointer data)
{
  HlComponentItem *item = HL_COMPONENT_ITEM (gtk_event_controller_get_widget (GTK_EVENT_CONTROLLER (controller)));
  HlCanvas *self = data;
  if (self->mode == MODE_NONE && !hl_session_is_selected (self->session, hl_component_item_id (item)))
    hl_session_select (self->session, hl_component_item_id (item), FALSE);
  return FALSE;
}

static HlComponentItem *
add_item (HlCanvas *self, const HlComponent *component)
{
  GtkWidget *item = hl_component_item_new ();
  GtkEventController *focus = gtk_event_controller_focus_new ();
  g_signal_connect (focus, "enter", G_CALLBACK (focus_enter_cb), self);
  gtk_widget_add_controller (item, focus);
  gtk_widget_insert_before (item, GTK_WIDGET (self), self->popover);
  g_hash_table_insert (self->items, (gpointer) component->id, item);
  return HL_COMPONENT_ITEM (item);
}

/* Figures, and how it differs from what it is marked against. */
static char *
describe (HlCanvas *self, const HlComponent *component, const char *figures)
{
  const char *mark = hl_canvas_mark_words (self, component->id);
  if (mark == NULL)
    return g_strdup (figures);
  return figures != NULL ? g_strdup_printf ("%s, %s", figures, mark) : g_strdup (mark);
}

static void
sync_items (HlCanvas *self)
{
  HlPlant *plant = hl_canvas_plant (self);
  GtkRoot *root = gtk_widget_get_root (GTK_WIDGET (self));
  GtkWidget *focus = root != NULL ? gtk_root_get_focus (root) : NULL;
  gboolean had_focus = focus != NULL && HL_IS_COMPONENT_ITEM (focus) && gtk_widget_is_ancestor (focus, GTK_WIDGET (self));

  g_hash_table_foreach_remove (self->items, has_gone, plant);
  for (guint n = 0; n < hl_plant_n_components (plant); n++)
    {
      const HlComponent *component = hl_plant_component (plant, n);
      HlComponentItem *item = hl_canvas_item (self, component->id);
      if (item == NULL)
        item = add_item (self, component);
      g_autofree char *description = describe (self, component, hl_layout_component (self->layout, n)->title_lines[1]);
      hl_component_item_show (item, component, description, hl_session_is_selected (self->session, component->id));
    }
  /* A deleted item takes the focus with it; the keys of the canvas must go on working. */
  if (had_focus && gtk_root_get_focus (root) != focus)
    gtk_widget_grab_focus (GTK_WIDGET (self));
}

static void
trace_place (HlCanvas *self, const char *word, const HlComponent *component, const char *port)
{
  g_autofree char *name = port != NULL ? g_strconcat (component->id, ".", port, NULL) : g_strdup (component->id);
  double vx, vy;
  if (hl_canvas_locate (self, component->id, port, &vx, &vy))
    hl_trace_place (word, name, GTK_WIDGET (self), vx, vy);
}

static void
trace_shaft_end (HlCanvas *self, const HlComponent *component, int end)
{
  g_autofree char *name = g_strdup_printf ("%s.%d", component->id, end);
  double x, y, vx, vy;
  if (!hl_canvas_shaft_end (hl_canvas_plant (self), component, end, &x, &y))
    return;
  hl_canvas_to_view (self, x, y, &vx, &vy);
  hl_trace_place ("shaft", name, GTK_WIDGET (self), vx, vy);
}

static gboolean
trace_cb (gpointer data)
{
  HlCanvas *self = data;
  HlPlant *plant = hl_canvas_plant (self);

  self->trace_source = 0;
  hl_trace_place ("canvas", "left-top", GTK_WIDGET (self), 0, 0);
  hl_trace_place ("canvas", "right-bottom", GTK_WIDGET (self), gtk_widget_get_width (GTK_WIDGET (self)), gtk_widget_get_height (GTK_WIDGET (self)));
  for (guint n = 0; n < hl_plant_n_components (plant); n++)
    {
      const HlComponent *component = hl_plant_component (plant, n);
      trace_place (self, "place", component, NULL);
      for (guint k = 0; k < hl_component_n_ports (component); k++)
        trace_place (self, "port", component, hl_component_port (component, k).key);
      for (int end = 0; end < 2; end++)
        trace_shaft_end (self, component, end);
    }
  hl_trace ("settled");
  return G_SOURCE_REMOVE;
}

/* Tells whoever drives the program where things are, once they rest. */
static void
trace_later (HlCanvas *self)
{
  if (!hl_trace_is_on ())
    return;
  g_clear_handle_id (&self->trace_source, g_source_remove);
  self->trace_source = g_timeout_add (60, trace_cb, self);
}

/* In the middle of a drag what is not touched stays where it is; afterwards everything is laid out afresh. */
static void
lay_out_from (HlCanvas *self, HlLayout *previous)
{
  HlLayout *layout = hl_layout_next (previous, hl_canvas_plant (self), self->shown, hl_appearance_theme ());
  g_clear_pointer (&self->layout, hl_layout_unref);
  self->layout = layout;
  self->theme = hl_appearance_theme ();
  sync_items (self);
  hl_canvas_renew_nodes (self);
  gtk_widget_queue_allocate (GTK_WIDGET (self));
  gtk_widget_queue_draw (GTK_WIDGET (self));
  trace_later (self);
}

static void
lay_out (HlCanvas *self)
{
  lay_out_from (self, NULL);
}

static void
previewed_cb (HlCanvas *self)
{
  lay_out_from (self, self->layout);
}

static void
changed_cb (HlCanvas *self)
{
  if (self->hovered != NULL && hl_plant_find_component (hl_canvas_plant (self), self->hovered) == NULL)
    self->hovered = NULL;
  self->hot.id = NULL;
  choose_shown_solution (self);
  hl_canvas_update_marks (self);
  lay_out (self);
}

static void
selection_changed_cb (HlCanvas *self)
{
  HlPlant *plant = hl_canvas_plant (self);
  guint n;
  const char *const *ids;

  if (self->layout == NULL)
    return;
  sync_items (self);
  hl_canvas_renew_nodes (self);
  gtk_widget_queue_draw (GTK_WIDGET (self));
  ids = hl_session_selection (self->session, &n);
  /* Keys go to what was selected last, when the canvas has them at all. */
  if (n == 1 && hl_plant_find_component (plant, ids[0]) != NULL && gtk_widget_get_focus_child (GTK_WIDGET (self)) != NULL
      && hl_canvas_item (self, ids[0]) != NULL)
    gtk_widget_grab_focus (GTK_WIDGET (hl_canvas_item (self, ids[0])));
}

static void
go_to_cb (HlCanvas *self, const char *text)
{
  HlAddress address;
  if (hl_address_parse (text, NULL, &address, NULL) && address.owner == HL_OWNER_COMPONENT)
    hl_canvas_reveal (self, address.id);
}

/* View */

static void
view_has_changed (HlCanvas *self)
{
  gtk_widget_queue_allocate (GTK_WIDGET (self));
  gtk_widget_queue_draw (GTK_WIDGET (self));
  trace_later (self);
}

void
hl_canvas_pan_to (HlCanvas *self, double ox, double oy)
{
  self->ox = floor (ox + 0.5);     /* whole pixels keep the lines sharp */
  self->oy = floor (oy + 0.5);
  self->is_fitted = FALSE;
  view_has_changed (self);
}

void
hl_canvas_zoom_at (HlCanvas *self, double zoom, double vx, double vy)
{
  double x, y;
  zoom = CLAMP (zoom, LEAST_ZOOM, MOST_ZOOM);
  if (fabs (zoom - 1.0) < 0.02)
    zoom = 1.0;
  hl_canvas_to_canvas (self, vx, vy, &x, &y);
  self->zoom = zoom;
  hl_canvas_pan_to (self, vx - zoom * x, vy - zoom * y);
  g_object_notify_by_pspec (G_OBJECT (self), properties[PROP_ZOOM]);
}

void
hl_canvas_zoom_by (HlCanvas *self, double factor)
{
  hl_canvas_zoom_at (self, self->zoom * factor, gtk_widget_get_width (GTK_WIDGET (self)) / 2.0, gtk_widget_get_height (GTK_WIDGET (self)) / 2.0);
}

/* Without a call that queues an allocation: runs inside one too. */
static void
fit_into (HlCanvas *self, double width, double height)
{
  HlBox box;
  double before = self->zoom;
  self->fit_width = (int) width;
  self->fit_height = (int) height;
  if (self->layout == NULL || hl_plant_n_components (hl_canvas_plant (self)) == 0)
    {
      self->zoom = 1.0;
      self->ox = floor (width / 2);
      self->oy = floor (height / 2);
    }
  else
    {
      hl_layout_extents (self->layout, &box);
      self->zoom = MIN ((width - 2 * FIT_MARGIN) / MAX (box.width, 1), (height - 2 * FIT_MARGIN) / MAX (box.height, 1));
      self->zoom = CLAMP (self->zoom, LEAST_ZOOM, FIT_ZOOM);
      self->ox = floor ((width - self->zoom * box.width) / 2 - self->zoom * box.x);
      self->oy = floor ((height - self->zoom * box.height) / 2 - self->zoom * box.y);
    }
  if (fabs (before - self->zoom) > 1e-9)
    g_object_notify_by_pspec (G_OBJECT (self), properties[PROP_ZOOM]);
}

void
hl_canvas_fit (HlCanvas *self)
{
  int width = gtk_widget_get_width (GTK_WIDGET (self)), height = gtk_widget_get_height (GTK_WIDGET (self));
  if (width > 1 && height > 1)
    fit_into (self, width, height);
  view_has_changed (self);
  self->is_fitted = TRUE;
}

void
hl_canvas_middle (HlCanvas *self, int *x, int *y)
{
  int width = gtk_widget_get_width (GTK_WIDGET (self)), height = gtk_widget_get_height (GTK_WIDGET (self));
  hl_canvas_to_grid (self, width / 2.0, height / 2.0, x, y);
  *x &= ~1;
  *y &= ~1;
}

void
hl_canvas_reveal (HlCanvas *self, const char *id)
{
  const double margin = 60;
  double vx, vy, width = gtk_widget_get_width (GTK_WIDGET (self)), height = gtk_widget_get_height (GTK_WIDGET (self));
  double dx = 0, dy = 0;
  if (width < 2 * margin || height < 2 * margin || !hl_canvas_locate (self, id, NULL, &vx, &vy))
    return;
  dx = CLAMP (vx, margin, width - margin) - vx;
  dy = CLAMP (vy, margin, height - margin) - vy;
  if (dx < 0 || dx > 0 || dy < 0 || dy > 0)
    hl_canvas_pan_to (self, self->ox + dx, self->oy + dy);
}

double
hl_canvas_get_zoom (HlCanvas *self)
{
  return self->zoom;
}

void
hl_canvas_say (HlCanvas *self, const char *text)
{
  g_signal_emit_by_name (self->session, "message", text);
}

void
hl_canvas_set_popover (HlCanvas *self, GtkWidget *popover, double vx, double vy)
{
  if (self->popover != NULL)
    gtk_popover_popdown (GTK_POPOVER (self->popover));     /* the pointer leaves it before its surface goes */
  g_clear_pointer (&self->popover, gtk_widget_unparent);
  self->popover = popover;
  gtk_widget_set_parent (popover, GTK_WIDGET (self));
  gtk_popover_set_pointing_to (GTK_POPOVER (popover), &(GdkRectangle) { (int) vx, (int) vy, 1, 1 });
  gtk_popover_popup (GTK_POPOVER (popover));
}

/* Widget */

static void
hl_canvas_measure (GtkWidget *widget, GtkOrientation orientation, int for_size, int *minimum, int *natural,
                   int *minimum_baseline, int *natural_baseline)
{
  *minimum = 160;
  *natural = orientation == GTK_ORIENTATION_HORIZONTAL ? 800 : 400;
}

static void
hl_canvas_size_allocate (GtkWidget *widget, int width, int height, int baseline)
{
  HlCanvas *self = HL_CANVAS (widget);
  /* A fitted view follows the size, not the plant: what is being edited must not jump. */
  if (self->is_fitted && (width != self->fit_width || height != self->fit_height))
    {
      fit_into (self, width, height);
      trace_later (self);
    }
  for (GtkWidget *child = gtk_widget_get_first_child (widget); child != NULL; child = gtk_widget_get_next_sibling (child))
    {
      GskTransform *transform;
      graphene_rect_t box;
      if (GTK_IS_POPOVER (child))
        {
          gtk_popover_present (GTK_POPOVER (child));    /* else it stays misplaced */
          continue;
        }
      hl_component_item_box (HL_COMPONENT_ITEM (child), &box);
      transform = gsk_transform_translate (NULL, &GRAPHENE_POINT_INIT (self->ox, self->oy));
      transform = gsk_transform_scale (transform, self->zoom, self->zoom);
      transform = gsk_transform_translate (transform, &box.origin);
      gtk_widget_allocate (child, box.size.width, box.size.height, -1, transform);
    }
}

static void
hl_canvas_snapshot (GtkWidget *widget, GtkSnapshot *snapshot)
{
  hl_canvas_draw (HL_CANVAS (widget), snapshot);
}

static void
hl_canvas_css_changed (GtkWidget *widget, GtkCssStyleChange *change)
{
  HlCanvas *self = HL_CANVAS (widget);
  GTK_WIDGET_CLASS (hl_canvas_parent_class)->css_changed (widget, change);
  /* Hovering and focus change styles, too; only another theme changes the drawing. */
  if (self->layout != NULL && self->theme != hl_appearance_theme ())
    lay_out (self);
}

static gboolean
hl_canvas_focus (GtkWidget *widget, GtkDirectionType direction)
{
  /* First the canvas itself, then its components one by one. */
  if (!gtk_widget_has_focus (widget) && gtk_widget_get_focus_child (widget) == NULL && direction != GTK_DIR_TAB_BACKWARD)
    return gtk_widget_grab_focus (widget);
  return GTK_WIDGET_CLASS (hl_canvas_parent_class)->focus (widget, direction);
}

static void
hl_canvas_get_property (GObject *object, guint id, GValue *value, GParamSpec *spec)
{
  if (id == PROP_ZOOM)
    g_value_set_double (value, HL_CANVAS (object)->zoom);
  else
    G_OBJECT_WARN_INVALID_PROPERTY_ID (object, id, spec);
}

static void
hl_canvas_dispose (GObject *object)
{
  HlCanvas *self = HL_CANVAS (object);
  g_clear_handle_id (&self->trace_source, g_source_remove);
  hl_canvas_drop_line (self);
  g_clear_pointer (&self->popover, gtk_widget_unparent);
  if (self->session != NULL)
    g_signal_handlers_disconnect_by_data (self->session, self);
  g_hash_table_remove_all (self->items);
  hl_canvas_forget_marks (self);
  G_OBJECT_CLASS (hl_canvas_parent_class)->dispose (object);
}

static void
hl_canvas_finalize (GObject *object)
{
  HlCanvas *self = HL_CANVAS (object);
  g_clear_object (&self->session);
  g_clear_pointer (&self->layout, hl_layout_unref);
  g_clear_pointer (&self->shown, hl_solution_unref);
  g_clear_pointer (&self->base, hl_plant_unref);
  g_clear_pointer (&self->items, g_hash_table_unref);
  g_clear_pointer (&self->lines, g_array_unref);
  g_clear_pointer (&self->labels, g_array_unref);
  g_clear_pointer (&self->titles, g_array_unref);
  g_clear_pointer (&self->shafts, g_array_unref);
  g_clear_pointer (&self->targets, g_array_unref);
  g_clear_pointer (&self->bend_way, g_array_unref);
  hl_kept_node_clear (&self->dots);
  G_OBJECT_CLASS (hl_canvas_parent_class)->finalize (object);
}

static GArray *
kept_nodes_new (void)
{
  GArray *nodes = g_array_new (FALSE, TRUE, sizeof (HlKeptNode));
  g_array_set_clear_func (nodes, hl_kept_node_clear);
  return nodes;
}

static void
hl_canvas_init (HlCanvas *self)
{
  self->zoom = 1.0;
  self->drop_stream = self->branch = -1;
  self->items = g_hash_table_new_full (g_str_hash, g_str_equal, NULL, item_unparent);
  self->lines = kept_nodes_new ();
  self->labels = kept_nodes_new ();
  self->titles = kept_nodes_new ();
  self->shafts = kept_nodes_new ();
  self->targets = g_array_new (FALSE, FALSE, sizeof (HlPortRef));
  gtk_widget_set_overflow (GTK_WIDGET (self), GTK_OVERFLOW_HIDDEN);
  gtk_widget_set_focusable (GTK_WIDGET (self), TRUE);
  hl_canvas_add_gestures (self);
  gtk_accessible_update_property (GTK_ACCESSIBLE (self), GTK_ACCESSIBLE_PROPERTY_LABEL, _("Canvas"),
                                  GTK_ACCESSIBLE_PROPERTY_DESCRIPTION, _("The drawing of the plant; Tab goes from component to component"), -1);
}

static void
add_move_key (GtkWidgetClass *class, guint key, guint keypad_key, int dx, int dy)
{
  const struct { GdkModifierType modifiers; int step; } ways[] = { { 0, 1 }, { GDK_SHIFT_MASK, 5 } };
  for (guint n = 0; n < G_N_ELEMENTS (ways); n++)
    {
      gtk_widget_class_add_binding_action (class, key, ways[n].modifiers, "win.nudge", "(ii)", dx * ways[n].step, dy * ways[n].step);
      gtk_widget_class_add_binding_action (class, keypad_key, ways[n].modifiers, "win.nudge", "(ii)", dx * ways[n].step, dy * ways[n].step);
    }
}

/* One-key shortcuts belong here: as shortcuts of the program they would fire while a number is typed.  Of several keys for
 * one action menus show the last. */
static void
add_keys (GtkWidgetClass *class)
{
  static const struct { guint key; GdkModifierType modifiers; const char *action; } keys[] = {
    { GDK_KEY_r, 0, "win.turn" }, { GDK_KEY_m, 0, "win.mirror" }, { GDK_KEY_c, 0, "win.connect-menu" },
    { GDK_KEY_BackSpace, 0, "win.delete" }, { GDK_KEY_KP_Delete, 0, "win.delete" }, { GDK_KEY_Delete, 0, "win.delete" },
    { GDK_KEY_a, GDK_CONTROL_MASK, "win.select-all" }, { GDK_KEY_d, GDK_CONTROL_MASK, "win.duplicate" },
    { GDK_KEY_c, GDK_CONTROL_MASK, "win.copy" }, { GDK_KEY_x, GDK_CONTROL_MASK, "win.cut" }, { GDK_KEY_v, GDK_CONTROL_MASK, "win.paste" },
    { GDK_KEY_Escape, 0, "win.deselect" },
    { GDK_KEY_plus, 0, "win.zoom-in" }, { GDK_KEY_plus, GDK_SHIFT_MASK, "win.zoom-in" }, { GDK_KEY_equal, 0, "win.zoom-in" },
    { GDK_KEY_KP_Add, 0, "win.zoom-in" }, { GDK_KEY_minus, 0, "win.zoom-out" }, { GDK_KEY_KP_Subtract, 0, "win.zoom-out" },
    { GDK_KEY_KP_0, 0, "win.zoom-fit" }, { GDK_KEY_0, 0, "win.zoom-fit" }, { GDK_KEY_1, 0, "win.zoom-normal" },
  };
  for (guint n = 0; n < G_N_ELEMENTS (keys); n++)
    gtk_widget_class_add_binding_action (class, keys[n].key, keys[n].modifiers, keys[n].action, NULL);
  add_move_key (class, GDK_KEY_Left, GDK_KEY_KP_Left, -1, 0);
  add_move_key (class, GDK_KEY_Right, GDK_KEY_KP_Right, 1, 0);
  add_move_key (class, GDK_KEY_Up, GDK_KEY_KP_Up, 0, -1);
  add_move_key (class, GDK_KEY_Down, GDK_KEY_KP_Down, 0, 1);
}

static void
hl_canvas_class_init (HlCanvasClass *class)
{
  GtkWidgetClass *widget = GTK_WIDGET_CLASS (class);
  GObjectClass *object = G_OBJECT_CLASS (class);
  object->dispose = hl_canvas_dispose;
  object->finalize = hl_canvas_finalize;
  object->get_property = hl_canvas_get_property;
  widget->measure = hl_canvas_measure;
  widget->size_allocate = hl_canvas_size_allocate;
  widget->snapshot = hl_canvas_snapshot;
  widget->css_changed = hl_canvas_css_changed;
  widget->focus = hl_canvas_focus;
  gtk_widget_class_set_css_name (widget, "canvas");
  gtk_widget_class_set_accessible_role (widget, GTK_ACCESSIBLE_ROLE_GROUP);
  add_keys (widget);
  properties[PROP_ZOOM] = g_param_spec_double ("zoom", NULL, NULL, LEAST_ZOOM, MOST_ZOOM, 1.0, G_PARAM_READABLE | G_PARAM_STATIC_STRINGS);
  g_object_class_install_properties (object, N_PROPERTIES, properties);
}

GtkWidget *
hl_canvas_new (HlSession *session)
{
  HlCanvas *self = g_object_new (HL_TYPE_CANVAS, NULL);
  self->session = g_object_ref (session);
  g_signal_connect_swapped (session, "changed", G_CALLBACK (changed_cb), self);
  g_signal_connect_swapped (session, "previewed", G_CALLBACK (previewed_cb), self);
  g_signal_connect_swapped (session, "selection-changed", G_CALLBACK (selection_changed_cb), self);
  g_signal_connect_swapped (session, "go-to", G_CALLBACK (go_to_cb), self);
  self->is_fitted = TRUE;
  changed_cb (self);
  return GTK_WIDGET (self);
}
