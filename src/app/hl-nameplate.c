/* The side pane that shows and edits the selection, or the plant where nothing is selected.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "app/hl-nameplate-private.h"
#include "app/hl-pane.h"
#include "plant/i18n.h"

#define PANE_WIDTH 306

struct _HlNameplate {
  GtkWidget        parent_instance;
  HlSession       *session;
  HlNameplateHead *head;
  HlNameplateBody *body;
  GtkWidget       *scroller;
  char            *subject;       /* whose rows are in the body: "T1 turbine" */
  GHashTable      *drafts;        /* address -> text typed but not taken when the selection changed */
  char            *file;          /* path of the plant that the drafts belong to */
  gboolean         is_updating;
};

G_DEFINE_FINAL_TYPE (HlNameplate, hl_nameplate, GTK_TYPE_WIDGET)

/* --- drafts --- */

static void
keep_draft (GtkWidget *row, gpointer data)
{
  HlNameplate *self = data;

  if (!HL_IS_QUANTITY_ROW (row))
    return;
  char *text = hl_quantity_row_take_draft (HL_QUANTITY_ROW (row));
  if (text != NULL)
    g_hash_table_insert (self->drafts, hl_address_to_text (hl_quantity_row_address (HL_QUANTITY_ROW (row))), text);
}

static void
give_draft_back (GtkWidget *row, gpointer data)
{
  HlNameplate *self = data;

  if (!HL_IS_QUANTITY_ROW (row))
    return;
  g_autofree char *key = hl_address_to_text (hl_quantity_row_address (HL_QUANTITY_ROW (row)));
  const char *text = g_hash_table_lookup (self->drafts, key);
  if (text == NULL)
    return;
  hl_quantity_row_put_draft (HL_QUANTITY_ROW (row), text);
  g_hash_table_remove (self->drafts, key);
}

/* Another plant, with a fresh history: what was typed into the one before belongs to nobody.  Saving under a new name
 * keeps the history, and the drafts. */
static void
file_changed_cb (HlNameplate *self)
{
  const char *path = hl_session_path (self->session);

  if (g_strcmp0 (path, self->file) == 0)
    return;
  g_free (self->file);
  self->file = g_strdup (path);
  if (!hl_session_can_undo (self->session) && !hl_session_can_redo (self->session))
    g_hash_table_remove_all (self->drafts);
}

/* --- update --- */

static char *
subject_now (HlNameplate *self, const HlComponent **component, const HlStream **stream, guint *n)
{
  const HlPlant *plant = hl_session_plant (self->session);
  const char *const *ids = hl_session_selection (self->session, n);

  *component = *n == 1 ? hl_plant_find_component (plant, ids[0]) : NULL;
  *stream = *n == 1 ? hl_plant_find_stream (plant, ids[0]) : NULL;
  if (*component != NULL)
    return g_strdup_printf ("component %s %s", (*component)->id, (*component)->kind->id);
  if (*stream != NULL)
    return g_strdup_printf ("stream %s", (*stream)->id);
  if (*n == 0)
    return g_strdup ("plant");
  /* Each set of components is a subject of its own: what is half typed for one set does not go to another. */
  GString *many = g_string_new ("many");
  for (guint i = 0; i < *n; i++)
    g_string_append_printf (many, " %s", ids[i]);
  return g_string_free (many, FALSE);
}

static void
update (HlNameplate *self)
{
  const HlComponent *component;
  const HlStream *stream;
  guint n;
  g_autofree char *subject = subject_now (self, &component, &stream, &n);
  gboolean is_other = g_strcmp0 (subject, self->subject) != 0;

  if (self->is_updating)
    return;
  self->is_updating = TRUE;
  if (is_other)
    {
      hl_nameplate_body_foreach (self->body, keep_draft, self);
      hl_nameplate_body_clear (self->body);
      g_free (self->subject);
      self->subject = g_strdup (subject);
      gtk_adjustment_set_value (gtk_scrolled_window_get_vadjustment (GTK_SCROLLED_WINDOW (self->scroller)), 0.0);
    }
  hl_nameplate_head_update (self->head);
  hl_nameplate_body_begin (self->body);
  if (component != NULL)
    hl_nameplate_fill_component (self->body, self->session, component);
  else if (stream != NULL)
    hl_nameplate_fill_stream (self->body, self->session, stream);
  else if (n == 0)
    hl_nameplate_fill_plant (self->body, self->session);
  else
    hl_nameplate_fill_many (self->body, self->session);
  hl_nameplate_body_end (self->body);
  if (is_other)
    hl_nameplate_body_foreach (self->body, give_draft_back, self);
  self->is_updating = FALSE;
}

/* --- going to a quantity --- */

static void
scroll_to (HlNameplate *self, GtkWidget *row)
{
  GtkAdjustment *adjustment = gtk_scrolled_window_get_vadjustment (GTK_SCROLLED_WINDOW (self->scroller));
  graphene_rect_t bounds;

  if (gtk_widget_compute_bounds (row, GTK_WIDGET (self->body), &bounds))
    gtk_adjustment_clamp_page (adjustment, bounds.origin.y - 24.0, bounds.origin.y + bounds.size.height + 24.0);
}

gboolean
hl_nameplate_focus (HlNameplate *self, const HlAddress *address)
{
  g_autofree char *key = hl_address_to_text (address);
  GtkWidget *row = hl_nameplate_body_find (self->body, key);

  if (row == NULL)
    return FALSE;
  scroll_to (self, row);
  return gtk_widget_grab_focus (row);
}

/* A state at a port stands in the nameplate of its stream where the component does not list it. */
static void
go_to_cb (HlSession *session, const char *text, HlNameplate *self)
{
  const HlPlant *plant = hl_session_plant (session);
  HlAddress address;
  const char *dot;

  if (!hl_address_parse (text, plant, &address, NULL) || hl_nameplate_focus (self, &address)
      || address.owner != HL_OWNER_COMPONENT || (dot = strrchr (address.key, '.')) == NULL)
    return;
  g_autofree char *port = g_strndup (address.key, dot - address.key);
  const HlStream *stream = hl_plant_stream_at (plant, address.id, port);
  if (stream == NULL || hl_stream_quantity_lookup (dot + 1) == NULL)
    return;
  HlAddress there = hl_address_stream (stream->id, g_intern_string (dot + 1));
  hl_session_select (session, stream->id, FALSE);
  hl_nameplate_focus (self, &there);
}

/* --- life --- */

static void
hl_nameplate_measure (GtkWidget *widget, GtkOrientation orientation, int for_size, int *minimum, int *natural, int *min_base, int *nat_base)
{
  GtkLayoutManager *layout = gtk_widget_get_layout_manager (widget);
  gtk_layout_manager_measure (layout, widget, orientation, for_size, minimum, natural, min_base, nat_base);
  if (orientation == GTK_ORIENTATION_HORIZONTAL)
    {
      *minimum = MAX (*minimum, PANE_WIDTH);
      *natural = MAX (*minimum, PANE_WIDTH);
    }
}

static void
hl_nameplate_dispose (GObject *object)
{
  HlNameplate *self = HL_NAMEPLATE (object);
  GtkWidget *child;

  if (self->session != NULL)
    g_signal_handlers_disconnect_by_data (self->session, self);
  self->is_updating = TRUE;
  if (self->body != NULL)
    hl_nameplate_body_foreach (self->body, keep_draft, self);      /* nothing commits any more */
  self->body = NULL;
  while ((child = gtk_widget_get_first_child (GTK_WIDGET (self))) != NULL)
    gtk_widget_unparent (child);
  g_clear_object (&self->session);
  g_clear_pointer (&self->subject, g_free);
  G_OBJECT_CLASS (hl_nameplate_parent_class)->dispose (object);
}

static void
hl_nameplate_finalize (GObject *object)
{
  g_hash_table_unref (HL_NAMEPLATE (object)->drafts);
  g_free (HL_NAMEPLATE (object)->file);
  G_OBJECT_CLASS (hl_nameplate_parent_class)->finalize (object);
}

static void
hl_nameplate_class_init (HlNameplateClass *klass)
{
  GtkWidgetClass *widget_class = GTK_WIDGET_CLASS (klass);
  G_OBJECT_CLASS (klass)->dispose = hl_nameplate_dispose;
  G_OBJECT_CLASS (klass)->finalize = hl_nameplate_finalize;
  widget_class->measure = hl_nameplate_measure;
  gtk_widget_class_set_layout_manager_type (widget_class, GTK_TYPE_BOX_LAYOUT);
  gtk_widget_class_set_css_name (widget_class, "nameplate");
  gtk_widget_class_set_accessible_role (widget_class, GTK_ACCESSIBLE_ROLE_GROUP);
}

static void
hl_nameplate_init (HlNameplate *self)
{
  gtk_orientable_set_orientation (GTK_ORIENTABLE (gtk_widget_get_layout_manager (GTK_WIDGET (self))), GTK_ORIENTATION_VERTICAL);
  self->drafts = g_hash_table_new_full (g_str_hash, g_str_equal, g_free, g_free);
  hl_pane_set_accessible (GTK_WIDGET (self), _("Nameplate"), _("Quantities of what is selected"));
}

GtkWidget *
hl_nameplate_new (HlSession *session)
{
  HlNameplate *self = g_object_new (HL_TYPE_NAMEPLATE, NULL);

  self->session = g_object_ref (session);
  self->head = HL_NAMEPLATE_HEAD (hl_nameplate_head_new (session));
  gtk_widget_set_parent (GTK_WIDGET (self->head), GTK_WIDGET (self));
  self->body = HL_NAMEPLATE_BODY (hl_nameplate_body_new ());
  self->scroller = gtk_scrolled_window_new ();
  gtk_scrolled_window_set_policy (GTK_SCROLLED_WINDOW (self->scroller), GTK_POLICY_NEVER, GTK_POLICY_AUTOMATIC);
  gtk_scrolled_window_set_child (GTK_SCROLLED_WINDOW (self->scroller), GTK_WIDGET (self->body));
  gtk_widget_set_vexpand (self->scroller, TRUE);
  gtk_widget_set_parent (self->scroller, GTK_WIDGET (self));
  g_signal_connect_swapped (session, "changed", G_CALLBACK (update), self);
  g_signal_connect_swapped (session, "selection-changed", G_CALLBACK (update), self);
  g_signal_connect_swapped (session, "file-changed", G_CALLBACK (file_changed_cb), self);
  g_signal_connect (session, "go-to", G_CALLBACK (go_to_cb), self);
  update (self);
  return GTK_WIDGET (self);
}
