/* Lines and shafts drawn by hand: ports under the pointer, valid targets, and the list of ports for the keyboard.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "app/hl-canvas-private.h"
#include "app/hl-edit.h"
#include "plant/i18n.h"

#define GRAB_RADIUS 9.0      /* round a port where a press takes it [view px] */
#define SNAP_RADIUS 18.0     /* round a target that catches the line */

/* Ports and shaft ends */

gboolean
hl_canvas_port_is_free (const HlPlant *plant, const HlPortRef *port)
{
  return hl_plant_stream_at (plant, port->id, port->port) == NULL;
}

gboolean
hl_canvas_port_point (HlCanvas *self, const HlPortRef *port, double *x, double *y)
{
  const HlComponent *component = hl_plant_find_component (hl_canvas_plant (self), port->id);
  HlSide side;
  guint n;
  int gx, gy;
  if (component == NULL || port->port == NULL || !hl_component_find_port (component, port->port, &n))
    return FALSE;
  hl_component_port_place (component, n, &gx, &gy, &side);
  *x = gx * HL_UNIT;
  *y = gy * HL_UNIT;
  return TRUE;
}

/* A shaft end that lies on a port leaves the place to the port. */
static gboolean
is_on_port (const HlComponent *component, int gx, int gy)
{
  for (guint n = 0; n < hl_component_n_ports (component); n++)
    {
      HlSide side;
      int px, py;
      hl_component_port_place (component, n, &px, &py, &side);
      if (ABS (px - gx) + ABS (py - gy) <= 1)
        return TRUE;
    }
  return FALSE;
}

gboolean
hl_canvas_shaft_end (const HlPlant *plant, const HlComponent *component, int end, double *x, double *y)
{
  int gx, gy;
  if (component->kind->shaft == HL_SHAFT_NONE)
    return FALSE;
  hl_component_shaft_place (component, end, &gx, &gy);
  if (is_on_port (component, gx, gy))
    return FALSE;
  *x = gx * HL_UNIT;
  *y = gy * HL_UNIT;
  return TRUE;
}

/* Small symbols keep their middle for moving them. */
static double
grab_radius (HlCanvas *self, const HlComponent *component)
{
  int hw, hh;
  hl_component_half_size (component, &hw, &hh);
  return MIN (GRAB_RADIUS / self->zoom, MIN (hw, hh) <= 1 ? 6.0 : 20.0);
}

gboolean
hl_canvas_port_at (HlCanvas *self, double vx, double vy, HlPortRef *port)
{
  HlPlant *plant = hl_canvas_plant (self);
  double x, y, nearest = G_MAXDOUBLE;
  hl_canvas_to_canvas (self, vx, vy, &x, &y);
  for (guint n = 0; n < hl_plant_n_components (plant); n++)
    {
      const HlComponent *component = hl_plant_component (plant, n);
      for (guint k = 0; k < hl_component_n_ports (component); k++)
        {
          HlPortRef ref = { component->id, hl_component_port (component, k).key };
          double px, py, distance;
          if (!hl_canvas_port_point (self, &ref, &px, &py))
            continue;
          distance = hypot (px - x, py - y);
          if (distance > grab_radius (self, component) || distance >= nearest || !hl_canvas_port_is_free (plant, &ref))
            continue;
          nearest = distance;
          *port = ref;
        }
    }
  return nearest < G_MAXDOUBLE;
}

gboolean
hl_canvas_shaft_end_at (HlCanvas *self, double vx, double vy, const char **id)
{
  HlPlant *plant = hl_canvas_plant (self);
  double x, y;
  hl_canvas_to_canvas (self, vx, vy, &x, &y);
  for (guint n = 0; n < hl_plant_n_components (plant); n++)
    for (int end = 0; end < 2; end++)
      {
        const HlComponent *component = hl_plant_component (plant, n);
        double sx, sy;
        if (hl_canvas_shaft_end (plant, component, end, &sx, &sy) && hypot (sx - x, sy - y) <= GRAB_RADIUS / self->zoom)
          {
            *id = component->id;
            return TRUE;
          }
      }
  return FALSE;
}

/* The line in progress */

/* While an end is moved to another port, the line itself occupies neither. */
static HlPlant *
plant_to_connect (HlCanvas *self)
{
  return self->replugged != NULL ? self->base : hl_canvas_plant (self);
}

static void
collect_targets (HlCanvas *self)
{
  HlPlant *plant = plant_to_connect (self);
  g_array_set_size (self->targets, 0);
  for (guint n = 0; n < hl_plant_n_components (plant); n++)
    {
      const HlComponent *component = hl_plant_component (plant, n);
      HlPortRef ref = { component->id, NULL };
      gboolean is_lit = FALSE;
      if (self->from.port == NULL)
        {
          is_lit = hl_edit_can_join (plant, self->from.id, component->id, NULL);
          if (is_lit)
            g_array_append_val (self->targets, ref);
        }
      else
        for (guint k = 0; k < hl_component_n_ports (component); k++)
          {
            ref.port = hl_component_port (component, k).key;
            if (!hl_edit_can_connect (plant, self->from.id, self->from.port, ref.id, ref.port, NULL))
              continue;
            g_array_append_val (self->targets, ref);
            is_lit = TRUE;
          }
      hl_component_item_set_lit (hl_canvas_item (self, component->id), is_lit);
    }
}

void
hl_canvas_begin_line (HlCanvas *self, const HlPortRef *from)
{
  self->from = *from;
  self->target = (HlPortRef) { 0 };
  self->mode = from->port != NULL ? MODE_CONNECT : MODE_SHAFT;
  collect_targets (self);
}

void
hl_canvas_begin_replug (HlCanvas *self, const char *stream, const HlPortRef *stays)
{
  const char *const ids[] = { stream, NULL };
  self->replugged = stream;
  self->base = hl_plant_without (hl_canvas_plant (self), ids);
  hl_canvas_begin_line (self, stays);
}

/* The nearest target: within reach, or any of the component that the pointer is on. */
static gboolean
find_target (HlCanvas *self, double vx, double vy, HlPortRef *found)
{
  const char *under = hl_canvas_component_at (self, vx, vy);
  double x, y, nearest = G_MAXDOUBLE;
  hl_canvas_to_canvas (self, vx, vy, &x, &y);
  for (guint n = 0; n < self->targets->len; n++)
    {
      const HlPortRef *target = &g_array_index (self->targets, HlPortRef, n);
      double tx, ty, distance;
      if (target->port == NULL)
        {
          if (target->id != under)
            continue;
          *found = *target;
          return TRUE;
        }
      if (!hl_canvas_port_point (self, target, &tx, &ty))
        continue;
      distance = hypot (tx - x, ty - y);
      if (distance >= nearest || (distance > SNAP_RADIUS / self->zoom && target->id != under))
        continue;
      nearest = distance;
      *found = *target;
    }
  return nearest < G_MAXDOUBLE;
}

/* The port of a component that is nearest to the pointer, free or not. */
static const char *
nearest_port (HlCanvas *self, const HlComponent *component, double x, double y)
{
  const char *found = NULL;
  double nearest = G_MAXDOUBLE;
  for (guint k = 0; k < hl_component_n_ports (component); k++)
    {
      HlPortRef ref = { component->id, hl_component_port (component, k).key };
      double px, py;
      if (hl_canvas_port_point (self, &ref, &px, &py) && hypot (px - x, py - y) < nearest)
        {
          nearest = hypot (px - x, py - y);
          found = ref.port;
        }
    }
  return found;
}

/* Why the line cannot end on the component under the pointer. */
static void
say_why_not (HlCanvas *self, double vx, double vy)
{
  const char *under = hl_canvas_component_at (self, vx, vy);
  const HlComponent *component = under != NULL ? hl_plant_find_component (hl_canvas_plant (self), under) : NULL;
  g_autoptr (GError) error = NULL;
  const char *port;
  double x, y;

  if (component == NULL || (self->mode == MODE_CONNECT && component->id == self->from.id))
    {
      hl_canvas_say (self, "");
      return;
    }
  hl_canvas_to_canvas (self, vx, vy, &x, &y);
  port = nearest_port (self, component, x, y);
  if (self->mode == MODE_SHAFT)
    hl_edit_can_join (hl_canvas_plant (self), self->from.id, under, &error);
  else if (port != NULL)
    hl_edit_can_connect (plant_to_connect (self), self->from.id, self->from.port, under, port, &error);
  hl_canvas_say (self, error != NULL ? error->message : "");
}

/* A line may end in the middle of another one, too. */
static gboolean
find_branch (HlCanvas *self, double vx, double vy)
{
  const HlStream *stream;
  self->branch = self->mode == MODE_CONNECT && self->replugged == NULL && hl_canvas_component_at (self, vx, vy) == NULL ? hl_canvas_stream_at (self, vx, vy) : -1;
  if (self->branch < 0)
    return FALSE;
  stream = hl_plant_stream (hl_canvas_plant (self), (guint) self->branch);
  hl_canvas_to_grid (self, vx, vy, &self->branch_x, &self->branch_y);
  self->branch_turn = hl_canvas_snap_to_line (hl_layout_stream (self->layout, (guint) self->branch), &self->branch_x, &self->branch_y);
  {
    g_autofree char *text = g_strdup_printf (_("Meet stream %s in a splitter or mixer"), stream->id);
    hl_canvas_say (self, text);
  }
  return TRUE;
}

void
hl_canvas_update_line (HlCanvas *self, double vx, double vy)
{
  HlPortRef found = { 0 };
  self->branch = -1;
  if (find_target (self, vx, vy, &found))
    {
      const HlComponent *component = hl_plant_find_component (hl_canvas_plant (self), found.id);
      guint n;
      if (found.port != NULL && hl_component_find_port (component, found.port, &n) && found.port != self->target.port)
        {
          g_autofree char *name = hl_component_port_name (component, n);
          g_autofree char *text = g_strdup_printf (_("Connect to %s of %s"), name, found.id);
          hl_canvas_say (self, text);
        }
    }
  else if (!find_branch (self, vx, vy))
    say_why_not (self, vx, vy);
  self->target = found;
  gtk_widget_queue_draw (GTK_WIDGET (self));
}

void
hl_canvas_drop_line (HlCanvas *self)
{
  GHashTableIter iter;
  gpointer item;
  self->from = self->target = (HlPortRef) { 0 };
  self->branch = -1;
  self->replugged = NULL;
  g_clear_pointer (&self->base, hl_plant_unref);
  if (self->targets != NULL)
    g_array_set_size (self->targets, 0);
  if (self->items == NULL)
    return;
  g_hash_table_iter_init (&iter, self->items);
  while (g_hash_table_iter_next (&iter, NULL, &item))
    hl_component_item_set_lit (item, FALSE);
}

void
hl_canvas_end_line (HlCanvas *self)
{
  HlPortRef from = self->from, target = self->target;
  HlCanvasMode mode = self->mode;
  int branch = self->branch;
  const char *replugged = self->replugged;

  hl_canvas_drop_line (self);
  self->mode = MODE_NONE;
  gtk_widget_queue_draw (GTK_WIDGET (self));
  if (branch >= 0)
    gtk_widget_activate_action (GTK_WIDGET (self), "win.branch", "(sssiii)", from.id, from.port,
                                hl_plant_stream (hl_canvas_plant (self), (guint) branch)->id, self->branch_x, self->branch_y, self->branch_turn);
  if (target.id == NULL)
    return;
  if (replugged != NULL)
    gtk_widget_activate_action (GTK_WIDGET (self), "win.replug", "(sss)", replugged, target.id, target.port);
  else if (mode == MODE_CONNECT)
    gtk_widget_activate_action (GTK_WIDGET (self), "win.connect", "(ssss)", from.id, from.port, target.id, target.port);
  else
    gtk_widget_activate_action (GTK_WIDGET (self), "win.join-shaft", "(ss)", from.id, target.id);
}

/* By keyboard: a list of the open ports, then of their targets */

typedef struct {
  HlCanvas *canvas;
  HlPortRef from, to;      /* to.id NULL: the row chooses where the line begins */
} Choice;

static void show_targets (HlCanvas *self, const HlPortRef *from);

static void
row_activated_cb (GtkListBox *list, GtkListBoxRow *row, gpointer data)
{
  const Choice *choice = g_object_get_data (G_OBJECT (row), "choice");
  Choice chosen;
  if (choice == NULL)
    return;
  chosen = *choice;
  if (chosen.to.id == NULL)
    {
      show_targets (chosen.canvas, &chosen.from);
      return;
    }
  gtk_popover_popdown (GTK_POPOVER (chosen.canvas->popover));
  gtk_widget_grab_focus (GTK_WIDGET (hl_canvas_item (chosen.canvas, chosen.from.id)));
  if (chosen.from.port != NULL)
    gtk_widget_activate_action (GTK_WIDGET (chosen.canvas), "win.connect", "(ssss)", chosen.from.id, chosen.from.port, chosen.to.id, chosen.to.port);
  else
    gtk_widget_activate_action (GTK_WIDGET (chosen.canvas), "win.join-shaft", "(ss)", chosen.from.id, chosen.to.id);
}

static void
append_row (GtkWidget *list, const Choice *choice, const char *text)
{
  GtkWidget *row = gtk_list_box_row_new (), *label = gtk_label_new (text);
  gtk_label_set_xalign (GTK_LABEL (label), 0.0f);
  gtk_list_box_row_set_child (GTK_LIST_BOX_ROW (row), label);
  if (choice != NULL)
    g_object_set_data_full (G_OBJECT (row), "choice", g_memdup2 (choice, sizeof *choice), g_free);
  else
    gtk_list_box_row_set_activatable (GTK_LIST_BOX_ROW (row), FALSE);
  gtk_list_box_append (GTK_LIST_BOX (list), row);
}

static char *
port_words (const HlComponent *component, const char *port)
{
  guint n;
  g_autofree char *name = NULL;
  if (port == NULL || !hl_component_find_port (component, port, &n))
    return g_strdup_printf (_("%s: shaft"), component->id);
  name = hl_component_port_name (component, n);
  return g_strdup_printf ("%s: %s", component->id, name);
}

static GtkWidget *
list_new (const char *heading, GtkWidget **popover)
{
  GtkWidget *box = gtk_box_new (GTK_ORIENTATION_VERTICAL, 4), *label = gtk_label_new (heading);
  GtkWidget *list = gtk_list_box_new (), *scrolled = gtk_scrolled_window_new ();
  gtk_label_set_xalign (GTK_LABEL (label), 0.0f);
  gtk_widget_add_css_class (label, "popover-heading");
  gtk_widget_add_css_class (list, "port-list");
  gtk_scrolled_window_set_policy (GTK_SCROLLED_WINDOW (scrolled), GTK_POLICY_NEVER, GTK_POLICY_AUTOMATIC);
  gtk_scrolled_window_set_propagate_natural_height (GTK_SCROLLED_WINDOW (scrolled), TRUE);
  gtk_scrolled_window_set_max_content_height (GTK_SCROLLED_WINDOW (scrolled), 320);
  gtk_scrolled_window_set_child (GTK_SCROLLED_WINDOW (scrolled), list);
  gtk_box_append (GTK_BOX (box), label);
  gtk_box_append (GTK_BOX (box), scrolled);
  gtk_list_box_set_selection_mode (GTK_LIST_BOX (list), GTK_SELECTION_NONE);
  g_signal_connect (list, "row-activated", G_CALLBACK (row_activated_cb), NULL);
  *popover = gtk_popover_new ();
  gtk_widget_add_css_class (*popover, "ports");
  gtk_popover_set_child (GTK_POPOVER (*popover), box);
  return list;
}

static void
show_list (HlCanvas *self, GtkWidget *popover, GtkWidget *list, const char *id)
{
  GtkWidget *first = gtk_widget_get_first_child (list);
  double vx = 0, vy = 0;
  hl_canvas_locate (self, id, NULL, &vx, &vy);
  hl_canvas_set_popover (self, popover, vx, vy);
  if (first != NULL)
    gtk_widget_grab_focus (first);
}

static void
show_targets (HlCanvas *self, const HlPortRef *from)
{
  HlPlant *plant = hl_canvas_plant (self);
  const HlComponent *component = hl_plant_find_component (plant, from->id);
  g_autofree char *words = port_words (component, from->port);
  g_autofree char *heading = g_strdup_printf (_("Connect %s to"), words);
  GtkWidget *popover, *list = list_new (heading, &popover);

  self->from = *from;
  collect_targets (self);
  for (guint n = 0; n < self->targets->len; n++)
    {
      Choice choice = { self, *from, g_array_index (self->targets, HlPortRef, n) };
      g_autofree char *text = port_words (hl_plant_find_component (plant, choice.to.id), choice.to.port);
      append_row (list, &choice, text);
    }
  if (self->targets->len == 0)
    append_row (list, NULL, _("Nothing free fits here"));
  hl_canvas_drop_line (self);
  show_list (self, popover, list, from->id);
}

void
hl_canvas_ask_connection (HlCanvas *self, const char *id)
{
  HlPlant *plant = hl_canvas_plant (self);
  const HlComponent *component = hl_plant_find_component (plant, id);
  g_autofree char *heading = NULL;
  GtkWidget *popover, *list;
  guint count = 0;
  Choice choice = { .canvas = self };

  if (component == NULL)
    return;
  heading = g_strdup_printf (_("Connect %s: from which port?"), component->id);
  list = list_new (heading, &popover);
  for (guint n = 0; n < hl_component_n_ports (component); n++)
    {
      HlPortRef ref = { component->id, hl_component_port (component, n).key };
      g_autofree char *name = hl_component_port_name (component, n);
      if (!hl_canvas_port_is_free (plant, &ref))
        continue;
      choice.from = ref;
      append_row (list, &choice, name);
      count++;
    }
  if (component->kind->shaft != HL_SHAFT_NONE)
    {
      choice.from = (HlPortRef) { component->id, NULL };
      append_row (list, &choice, _("shaft"));
      count++;
    }
  if (count == 0)
    append_row (list, NULL, _("Every port is connected"));
  show_list (self, popover, list, id);
}
