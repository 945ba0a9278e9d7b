/* One quantity of several components at once: what is typed is given to all of them.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "app/hl-shared-row.h"
#include "app/hl-pane.h"
#include "plant/i18n.h"

#include <math.h>

struct _HlSharedRow {
  GtkWidget  parent_instance;
  HlSession *session;
  const char *key;               /* interned */
  GtkWidget *line, *entry, *unit, *pill, *note;
  char      *shown;              /* the text last put into the entry */
  gboolean   is_focused, is_retired;
};

G_DEFINE_FINAL_TYPE (HlSharedRow, hl_shared_row, GTK_TYPE_WIDGET)

/* --- the edit --- */

static void
say_yielded (GString *said, GArray *yielded)
{
  for (guint n = 0; yielded != NULL && n < yielded->len; n++)
    g_string_append_printf (said, "%s%s", said->len > 0 ? " · " : "", g_array_index (yielded, HlYield, n).text);
}

/* Each value settles by itself, as if typed one after the other. */
static HlPlant *
plant_with_text (HlPlant *plant, const HlAddress *address, const char *text, GString *said, GError **error)
{
  g_autoptr (GArray) yielded = NULL;
  HlValue value;

  if (*text != '\0' && !hl_value_parse (plant, address, text, &value, error))
    return NULL;
  g_autoptr (HlPlant) with = hl_plant_with_value (plant, address, *text != '\0' ? &value : NULL, error);
  if (with == NULL)
    return NULL;
  HlPlant *settled = hl_settle (with, address, &yielded);
  say_yielded (said, yielded);
  return settled;
}

gboolean
hl_shared_set_text (HlSession *session, const char *const *ids, guint n_ids, const char *key, const char *text, GError **error)
{
  g_autofree char *trimmed = g_strstrip (g_strdup (text));
  g_autoptr (HlPlant) plant = hl_plant_ref (hl_session_base (session));
  g_autoptr (GString) said = g_string_new (NULL);
  const HlQuantityKind *kind = NULL;
  guint n_done = 0;

  for (guint n = 0; n < n_ids; n++)
    {
      HlAddress address = hl_address_component (ids[n], key);
      if (hl_plant_find_component (plant, ids[n]) == NULL)
        continue;
      kind = hl_plant_quantity_kind (plant, &address);
      HlPlant *next = plant_with_text (plant, &address, trimmed, said, error);
      if (next == NULL)
        return FALSE;
      hl_plant_unref (plant);
      plant = next;
      n_done++;
    }
  if (kind == NULL)
    return TRUE;
  g_autofree char *name = g_strdup_printf (ngettext_hl ("Set %s of %u component", "Set %s of %u components", n_done), _(kind->name), n_done);
  hl_session_apply (session, name, hl_plant_ref (plant), NULL, FALSE);
  g_signal_emit_by_name (session, "message", said->str);
  return TRUE;
}

/* --- what is shown --- */

typedef struct {
  guint    n;
  gboolean is_known, is_various, has_origins;    /* has_origins: more than one origin */
  double   si;
  HlOrigin origin;
  const HlQuantityKind *kind;
} Common;

static void
take_component (HlSharedRow *self, const char *id, Common *common)
{
  const HlPlant *plant = hl_session_plant (self->session);
  HlAddress address = hl_address_component (id, self->key);
  const HlQuantityKind *kind = hl_plant_find_component (plant, id) != NULL ? hl_plant_quantity_kind (plant, &address) : NULL;
  const HlValue *value;
  double si;

  if (kind == NULL)
    return;
  value = hl_plant_value_wherever (plant, &address, NULL);
  HlOrigin origin = value != NULL ? value->origin : HL_ORIGIN_FOUND;
  gboolean is_known = value != NULL && origin != HL_ORIGIN_TIED;
  if (is_known)
    si = value->value;
  else
    is_known = hl_solution_value (hl_session_solution (self->session), &address, &si) && isfinite (si);
  if (common->n++ == 0)
    {
      common->kind = kind;
      common->origin = origin;
      common->is_known = is_known;
      common->si = si;
      return;
    }
  common->has_origins |= origin != common->origin;
  if (is_known != common->is_known || (is_known && fabs (si - common->si) > 1e-9 * fabs (common->si)))
    common->is_various = TRUE;
}

static Common
look (HlSharedRow *self)
{
  Common common = { 0 };
  guint n;
  const char *const *ids = hl_session_selection (self->session, &n);

  for (guint i = 0; i < n; i++)
    take_component (self, ids[i], &common);
  return common;
}

static gboolean
is_typing (HlSharedRow *self)
{
  return g_strcmp0 (gtk_editable_get_text (GTK_EDITABLE (self->entry)), self->shown) != 0;
}

static void
set_note (HlSharedRow *self, const char *text)
{
  gtk_label_set_text (GTK_LABEL (self->note), text != NULL ? text : "");
  gtk_widget_set_visible (self->note, text != NULL);
  (text != NULL ? gtk_widget_add_css_class : gtk_widget_remove_css_class) (self->note, "error");
  (text != NULL ? gtk_widget_add_css_class : gtk_widget_remove_css_class) (self->entry, "error");
}

static void
set_origin_class (HlSharedRow *self, const char *id)
{
  for (HlOrigin other = HL_ORIGIN_FOUND; other <= HL_ORIGIN_TIED; other++)
    gtk_widget_remove_css_class (GTK_WIDGET (self), hl_origin_id (other));
  if (id != NULL)
    gtk_widget_add_css_class (GTK_WIDGET (self), id);
}

void
hl_shared_row_update (HlSharedRow *self)
{
  Common common = look (self);
  HlUnitSet units = hl_pane_units (self->session);
  g_autofree char *text = NULL;
  char *space;

  if (self->is_retired || common.n == 0)
    return;
  text = common.is_known && !common.is_various ? hl_quantity_format (common.kind, common.si, units) : g_strdup ("");
  gtk_label_set_text (GTK_LABEL (self->unit), hl_units_label (common.kind->dimension, units));
  if ((space = strchr (text, ' ')) != NULL)
    {
      gtk_label_set_text (GTK_LABEL (self->unit), space + 1);
      *space = '\0';
    }
  gtk_entry_set_placeholder_text (GTK_ENTRY (self->entry), common.is_various ? _("various") : "–");
  gtk_label_set_text (GTK_LABEL (self->pill), common.has_origins ? _("various") : hl_origin_name (common.origin));
  set_origin_class (self, common.has_origins ? NULL : hl_origin_id (common.origin));
  gtk_accessible_update_property (GTK_ACCESSIBLE (self->entry), GTK_ACCESSIBLE_PROPERTY_DESCRIPTION, common.is_various ? _("various") : text, -1);
  if (is_typing (self))
    return;
  g_free (self->shown);
  self->shown = g_steal_pointer (&text);
  gtk_editable_set_text (GTK_EDITABLE (self->entry), self->shown);
}

void
hl_shared_row_retire (HlSharedRow *self)
{
  self->is_retired = TRUE;
}

/* --- typing --- */

static void
restore (HlSharedRow *self)
{
  set_note (self, NULL);
  gtk_editable_set_text (GTK_EDITABLE (self->entry), self->shown);
}

static void
commit (HlSharedRow *self)
{
  g_autoptr (GError) error = NULL;
  guint n;
  const char *const *selection = hl_session_selection (self->session, &n);

  if (self->is_retired || !is_typing (self))
    return;
  g_autofree const char **ids = g_memdup2 (selection, n * sizeof *selection);    /* the selection may change under the edit */
  g_object_ref (self);
  if (!hl_shared_set_text (self->session, ids, n, self->key, gtk_editable_get_text (GTK_EDITABLE (self->entry)), &error))
    set_note (self, error->message);
  else if (!self->is_retired)
    {
      restore (self);
      hl_shared_row_update (self);
    }
  g_object_unref (self);
}

static void
activate_cb (GtkEntry *entry, HlSharedRow *self)
{
  commit (self);
}

static void
leave_cb (GtkEventControllerFocus *controller, HlSharedRow *self)
{
  commit (self);
}

static gboolean
key_cb (GtkEventControllerKey *controller, guint key, guint code, GdkModifierType state, HlSharedRow *self)
{
  if (key != GDK_KEY_Escape || (!is_typing (self) && !gtk_widget_get_visible (self->note)))
    return GDK_EVENT_PROPAGATE;
  restore (self);
  return GDK_EVENT_STOP;
}

/* --- life --- */

static void
hl_shared_row_dispose (GObject *object)
{
  HlSharedRow *self = HL_SHARED_ROW (object);
  GtkWidget *child;

  self->is_retired = TRUE;
  while ((child = gtk_widget_get_first_child (GTK_WIDGET (self))) != NULL)
    gtk_widget_unparent (child);
  g_clear_object (&self->session);
  g_clear_pointer (&self->shown, g_free);
  G_OBJECT_CLASS (hl_shared_row_parent_class)->dispose (object);
}

static gboolean
hl_shared_row_grab_focus (GtkWidget *widget)
{
  return gtk_widget_grab_focus (HL_SHARED_ROW (widget)->entry);
}

static void
hl_shared_row_class_init (HlSharedRowClass *klass)
{
  GtkWidgetClass *widget_class = GTK_WIDGET_CLASS (klass);
  G_OBJECT_CLASS (klass)->dispose = hl_shared_row_dispose;
  widget_class->grab_focus = hl_shared_row_grab_focus;
  gtk_widget_class_set_css_name (widget_class, "quantity");          /* looks like the row of one component */
  gtk_widget_class_set_layout_manager_type (widget_class, GTK_TYPE_BOX_LAYOUT);
  gtk_widget_class_set_accessible_role (widget_class, GTK_ACCESSIBLE_ROLE_GROUP);
}

static void
hl_shared_row_init (HlSharedRow *self)
{
  gtk_orientable_set_orientation (GTK_ORIENTABLE (gtk_widget_get_layout_manager (GTK_WIDGET (self))), GTK_ORIENTATION_VERTICAL);
  self->shown = g_strdup ("");
}

static void
build_entry (HlSharedRow *self)
{
  GtkEventController *focus = gtk_event_controller_focus_new (), *keys = gtk_event_controller_key_new ();

  self->entry = gtk_entry_new ();
  gtk_editable_set_alignment (GTK_EDITABLE (self->entry), 1.0f);
  gtk_editable_set_width_chars (GTK_EDITABLE (self->entry), 8);
  gtk_editable_set_max_width_chars (GTK_EDITABLE (self->entry), 8);
  gtk_widget_set_valign (self->entry, GTK_ALIGN_CENTER);
  g_signal_connect (self->entry, "activate", G_CALLBACK (activate_cb), self);
  g_signal_connect (focus, "leave", G_CALLBACK (leave_cb), self);
  gtk_widget_add_controller (self->entry, focus);
  gtk_event_controller_set_propagation_phase (keys, GTK_PHASE_CAPTURE);
  g_signal_connect (keys, "key-pressed", G_CALLBACK (key_cb), self);
  gtk_widget_add_controller (self->entry, keys);
}

GtkWidget *
hl_shared_row_new (HlSession *session, const char *key, const char *name)
{
  HlSharedRow *self = g_object_new (HL_TYPE_SHARED_ROW, NULL);
  GtkWidget *label = hl_pane_label (name, NULL);

  self->session = g_object_ref (session);
  self->key = g_intern_string (key);
  self->line = gtk_box_new (GTK_ORIENTATION_HORIZONTAL, 0);
  gtk_widget_add_css_class (self->line, "line");
  gtk_widget_add_css_class (label, "shared-name");
  gtk_label_set_wrap (GTK_LABEL (label), TRUE);
  gtk_widget_set_hexpand (label, TRUE);
  build_entry (self);
  self->unit = hl_pane_label ("", "unit");
  self->pill = gtk_label_new ("");
  gtk_widget_add_css_class (self->pill, "pill");
  gtk_widget_set_valign (self->pill, GTK_ALIGN_CENTER);
  gtk_box_append (GTK_BOX (self->line), label);
  gtk_box_append (GTK_BOX (self->line), self->entry);
  gtk_box_append (GTK_BOX (self->line), self->unit);
  gtk_box_append (GTK_BOX (self->line), self->pill);
  gtk_widget_set_parent (self->line, GTK_WIDGET (self));
  self->note = hl_pane_label ("", "note");
  gtk_label_set_wrap (GTK_LABEL (self->note), TRUE);
  gtk_widget_set_visible (self->note, FALSE);
  gtk_widget_set_parent (self->note, GTK_WIDGET (self));
  hl_pane_set_accessible (self->entry, name, NULL);
  hl_shared_row_update (self);
  return GTK_WIDGET (self);
}
