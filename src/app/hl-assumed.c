/* The list of assumed values: what nobody has confirmed yet, with its source.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "app/hl-assumed.h"
#include "app/hl-pane.h"
#include "plant/i18n.h"

struct _HlAssumed {
  GtkWidget  parent_instance;
  HlSession *session;
  GtkWidget *list;
  GArray    *addresses;       /* HlAddress, one a row */
};

G_DEFINE_FINAL_TYPE (HlAssumed, hl_assumed, GTK_TYPE_WIDGET)

static void
row_activated_cb (GtkListBox *list, GtkListBoxRow *row, HlAssumed *self)
{
  HlAddress address = g_array_index (self->addresses, HlAddress, gtk_list_box_row_get_index (row));
  GtkWidget *popover = gtk_widget_get_ancestor (GTK_WIDGET (self), GTK_TYPE_POPOVER);

  if (popover != NULL)
    gtk_popover_popdown (GTK_POPOVER (popover));
  hl_session_go_to (self->session, &address);
}

static GtkWidget *
assumed_row (const HlPlant *plant, const HlAddress *address, double si)
{
  const HlQuantityKind *kind = hl_plant_quantity_kind (plant, address);
  const HlComponent *owner = address->owner == HL_OWNER_COMPONENT ? hl_plant_find_component (plant, address->id) : NULL;
  const char *from = hl_component_default_source (owner, kind);
  GtkWidget *box = gtk_box_new (GTK_ORIENTATION_VERTICAL, 0), *line = gtk_box_new (GTK_ORIENTATION_HORIZONTAL, 12);
  g_autofree char *words = hl_plant_describe (plant, address);
  g_autofree char *text = hl_quantity_format (kind, si, hl_plant_units (plant));
  GtkWidget *name = hl_pane_label (words, NULL), *value = hl_pane_label (text, "number"), *row = gtk_list_box_row_new ();

  gtk_label_set_ellipsize (GTK_LABEL (name), PANGO_ELLIPSIZE_END);
  gtk_widget_set_hexpand (name, TRUE);
  gtk_box_append (GTK_BOX (line), name);
  gtk_box_append (GTK_BOX (line), value);
  gtk_box_append (GTK_BOX (box), line);
  if (from != NULL && *from != '\0')
    {
      GtkWidget *source = hl_pane_label (_(from), "quiet");
      gtk_label_set_ellipsize (GTK_LABEL (source), PANGO_ELLIPSIZE_END);
      gtk_widget_set_tooltip_text (source, _(from));
      gtk_box_append (GTK_BOX (box), source);
    }
  gtk_list_box_row_set_child (GTK_LIST_BOX_ROW (row), box);
  hl_pane_set_accessible (row, words, text);
  return row;
}

static void
add_values (HlAssumed *self, const HlPlant *plant, HlOwner owner, const char *id, const HlValues *values)
{
  for (guint n = 0; n < values->n; n++)
    {
      HlAddress address = { owner, id, values->entries[n].key };
      if (values->entries[n].value.origin != HL_ORIGIN_ASSUMED || hl_plant_quantity_kind (plant, &address) == NULL)
        continue;
      g_array_append_val (self->addresses, address);
      gtk_list_box_append (GTK_LIST_BOX (self->list), assumed_row (plant, &address, values->entries[n].value.value));
    }
}

static void
update (HlAssumed *self)
{
  const HlPlant *plant = hl_session_plant (self->session);
  GtkListBoxRow *row;

  while ((row = gtk_list_box_get_row_at_index (GTK_LIST_BOX (self->list), 0)) != NULL)
    gtk_list_box_remove (GTK_LIST_BOX (self->list), GTK_WIDGET (row));
  g_array_set_size (self->addresses, 0);
  for (guint n = 0; n < hl_plant_n_components (plant); n++)
    {
      const HlComponent *component = hl_plant_component (plant, n);
      add_values (self, plant, HL_OWNER_COMPONENT, component->id, &component->values);
    }
  for (guint n = 0; n < hl_plant_n_streams (plant); n++)
    {
      const HlStream *stream = hl_plant_stream (plant, n);
      add_values (self, plant, HL_OWNER_STREAM, stream->id, &stream->values);
    }
  add_values (self, plant, HL_OWNER_PLANT, g_intern_static_string (""), hl_plant_values (plant));
}

/* Only while it can be seen: the list may be long, and edits come many a second. */
static void
changed_cb (HlAssumed *self)
{
  if (gtk_widget_get_mapped (GTK_WIDGET (self)))
    update (self);
}

static void
hl_assumed_map (GtkWidget *widget)
{
  update (HL_ASSUMED (widget));
  GTK_WIDGET_CLASS (hl_assumed_parent_class)->map (widget);
}

static void
hl_assumed_dispose (GObject *object)
{
  HlAssumed *self = HL_ASSUMED (object);
  GtkWidget *child;

  if (self->session != NULL)
    g_signal_handlers_disconnect_by_data (self->session, self);
  while ((child = gtk_widget_get_first_child (GTK_WIDGET (self))) != NULL)
    gtk_widget_unparent (child);
  g_clear_object (&self->session);
  g_clear_pointer (&self->addresses, g_array_unref);
  G_OBJECT_CLASS (hl_assumed_parent_class)->dispose (object);
}

static void
hl_assumed_class_init (HlAssumedClass *klass)
{
  GtkWidgetClass *widget_class = GTK_WIDGET_CLASS (klass);
  G_OBJECT_CLASS (klass)->dispose = hl_assumed_dispose;
  widget_class->map = hl_assumed_map;
  gtk_widget_class_set_layout_manager_type (widget_class, GTK_TYPE_BOX_LAYOUT);
  gtk_widget_class_set_css_name (widget_class, "assumedlist");
}

static void
hl_assumed_init (HlAssumed *self)
{
  GtkWidget *title = hl_pane_label (_("Assumed, not confirmed by anybody yet"), "title"), *scroller = gtk_scrolled_window_new ();

  gtk_orientable_set_orientation (GTK_ORIENTABLE (gtk_widget_get_layout_manager (GTK_WIDGET (self))), GTK_ORIENTATION_VERTICAL);
  self->addresses = g_array_new (FALSE, FALSE, sizeof (HlAddress));
  gtk_widget_set_parent (title, GTK_WIDGET (self));
  self->list = gtk_list_box_new ();
  gtk_list_box_set_selection_mode (GTK_LIST_BOX (self->list), GTK_SELECTION_NONE);
  g_signal_connect (self->list, "row-activated", G_CALLBACK (row_activated_cb), self);
  hl_pane_set_accessible (self->list, _("Assumed values"), _("Return goes to the value in the nameplate"));
  gtk_scrolled_window_set_policy (GTK_SCROLLED_WINDOW (scroller), GTK_POLICY_NEVER, GTK_POLICY_AUTOMATIC);
  gtk_scrolled_window_set_child (GTK_SCROLLED_WINDOW (scroller), self->list);
  gtk_scrolled_window_set_propagate_natural_height (GTK_SCROLLED_WINDOW (scroller), TRUE);
  gtk_widget_set_parent (scroller, GTK_WIDGET (self));
}

GtkWidget *
hl_assumed_new (HlSession *session)
{
  HlAssumed *self = g_object_new (HL_TYPE_ASSUMED, NULL);

  self->session = g_object_ref (session);
  g_signal_connect_swapped (session, "changed", G_CALLBACK (changed_cb), self);
  return GTK_WIDGET (self);
}
