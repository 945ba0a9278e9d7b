/* One quantity of the nameplate: name, value with unit, origin, and below them errors and the explanation.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "app/hl-quantity-row-private.h"
#include "plant/i18n.h"

#include <math.h>

G_DEFINE_FINAL_TYPE (HlQuantityRow, hl_quantity_row, GTK_TYPE_WIDGET)

/* --- what the plant knows about the quantity --- */

HlAddress
hl_quantity_row_carrier (HlQuantityRow *self)
{
  const HlPlant *plant = hl_session_plant (self->session);
  const char *key = NULL;
  HlAddress where;

  if (hl_plant_value (plant, &self->address) != NULL)
    return self->address;
  const HlStream *stream = hl_state_stream (plant, &self->address, &key);
  if (stream != NULL && hl_plant_state_value (plant, stream, key, &where) != NULL)
    return where;
  return self->address;
}

const HlValue *
hl_quantity_row_value (HlQuantityRow *self)
{
  HlAddress carrier = hl_quantity_row_carrier (self);
  return hl_plant_value (hl_session_plant (self->session), &carrier);
}

gboolean
hl_quantity_row_number (HlQuantityRow *self, double *si)
{
  const HlValue *value = hl_quantity_row_value (self);

  if (value != NULL && value->origin != HL_ORIGIN_TIED)
    {
      *si = value->value;
      return TRUE;
    }
  return hl_solution_value (hl_session_solution (self->session), &self->address, si) && isfinite (*si);
}

/* "40.00 kW" parted into number and unit; a text without a unit keeps it empty. */
static char *
number_and_unit (char *text, char **unit)
{
  char *space = strchr (text, ' ');

  *unit = g_strdup (space != NULL ? space + 1 : "");
  if (space != NULL)
    *space = '\0';
  return text;
}

/* What stands in the entry and behind it when nobody types: rounded; with the focus every digit, and a tie as its
 * expression.  With the focus the unit behind the entry is the one that a bare number takes. */
static char *
value_text (HlQuantityRow *self, char **unit)
{
  const HlPlant *plant = hl_session_plant (self->session);
  const HlValue *value = hl_quantity_row_value (self);
  HlUnitSet units = hl_plant_units (plant);
  const char *bare_unit = hl_units_label (self->kind->dimension, units);
  g_autofree char *own_unit = NULL;
  double si;

  *unit = g_strdup (bare_unit);
  if (self->is_focused && value != NULL && value->origin == HL_ORIGIN_TIED)
    {
      HlAddress carrier = hl_quantity_row_carrier (self);
      g_autofree char *tie = hl_tie_format (plant, &carrier, value);
      return g_strconcat ("=", tie, NULL);
    }
  if (!hl_quantity_row_number (self, &si))
    return g_strdup ("");
  char *text = self->is_focused && value != NULL ? hl_quantity_format_exact (self->kind, si, units)
                                                 : hl_quantity_format (self->kind, si, units);
  char *number = number_and_unit (g_strdup (text), &own_unit);
  if (self->is_focused && strcmp (own_unit, bare_unit) != 0)
    {
      g_free (number);             /* "40 kW" beside MW: the number alone would say another thing */
      return text;
    }
  g_free (text);
  g_free (*unit);
  *unit = g_steal_pointer (&own_unit);
  return number;
}

/* --- the entry --- */

gboolean
hl_quantity_row_is_typing (HlQuantityRow *self)
{
  return g_strcmp0 (gtk_editable_get_text (GTK_EDITABLE (self->entry)), self->shown) != 0;
}

/* The entry is as wide as its text, with room to type in while it has the focus; the name gives way. */
static void
fit_entry (HlQuantityRow *self)
{
  long length = g_utf8_strlen (gtk_editable_get_text (GTK_EDITABLE (self->entry)), -1);
  gboolean is_edited = self->is_focused || hl_quantity_row_is_typing (self);
  int chars = (int) CLAMP (is_edited ? MAX (length + 1, 7) : length, 2, 17);

  gtk_widget_set_visible (self->origin_button, !is_edited || length <= 10);      /* room for a tie */

  if (gtk_editable_get_width_chars (GTK_EDITABLE (self->entry)) == chars)
    return;
  gtk_editable_set_width_chars (GTK_EDITABLE (self->entry), chars);
  gtk_editable_set_max_width_chars (GTK_EDITABLE (self->entry), chars);
}

static void
show_value (HlQuantityRow *self)
{
  g_autofree char *unit = NULL;
  g_autofree char *text = value_text (self, &unit);

  gtk_label_set_text (GTK_LABEL (self->unit), unit);
  gtk_widget_set_visible (self->unit, *unit != '\0');
  if (g_strcmp0 (text, self->shown) == 0 && !hl_quantity_row_is_typing (self))
    return;
  g_free (self->shown);
  self->shown = g_strdup (text);
  if (g_strcmp0 (gtk_editable_get_text (GTK_EDITABLE (self->entry)), text) != 0)
    gtk_editable_set_text (GTK_EDITABLE (self->entry), text);
  if (self->is_focused)
    gtk_editable_select_region (GTK_EDITABLE (self->entry), 0, -1);
  fit_entry (self);
}

void
hl_quantity_row_set_note (HlQuantityRow *self, const char *text, gboolean is_error)
{
  gtk_label_set_text (GTK_LABEL (self->note), text != NULL ? text : "");
  gtk_widget_set_visible (self->note, text != NULL);
  if (text != NULL && is_error)
    {
      gtk_widget_add_css_class (self->note, "error");
      gtk_widget_add_css_class (self->entry, "error");
      gtk_accessible_update_state (GTK_ACCESSIBLE (self->entry), GTK_ACCESSIBLE_STATE_INVALID, GTK_ACCESSIBLE_INVALID_TRUE, -1);
    }
  else
    {
      gtk_widget_remove_css_class (self->note, "error");
      gtk_widget_remove_css_class (self->entry, "error");
      gtk_accessible_reset_state (GTK_ACCESSIBLE (self->entry), GTK_ACCESSIBLE_STATE_INVALID);
    }
}

static void
restore (HlQuantityRow *self)
{
  hl_quantity_row_set_note (self, NULL, FALSE);
  show_value (self);
}

gboolean
hl_quantity_row_commit (HlQuantityRow *self)
{
  g_autoptr (GError) error = NULL;
  g_autofree char *text = g_strstrip (g_strdup (gtk_editable_get_text (GTK_EDITABLE (self->entry))));
  HlAddress carrier = hl_quantity_row_carrier (self);
  gboolean done;

  if (self->is_retired || !hl_quantity_row_is_typing (self))
    return TRUE;
  g_object_ref (self);               /* "changed" may take the row away */
  if (*text == '\0')
    done = hl_quantity_row_value (self) == NULL || hl_session_set_value (self->session, &carrier, NULL, &error);
  else
    done = hl_session_set_text (self->session, &carrier, text, &error);
  if (!self->is_retired)
    {
      if (done)
        restore (self);
      else
        hl_quantity_row_set_note (self, error->message, TRUE);
    }
  hl_quantity_row_update (self);
  g_object_unref (self);
  return done;
}

/* Return on an assumed value that was not touched confirms it. */
static void
confirm_assumed (HlQuantityRow *self)
{
  const HlValue *value = hl_quantity_row_value (self);

  if (value == NULL || value->origin != HL_ORIGIN_ASSUMED)
    return;
  HlValue given = *value;
  HlAddress carrier = hl_quantity_row_carrier (self);
  g_autoptr (GError) error = NULL;
  given.origin = HL_ORIGIN_GIVEN;
  if (!hl_session_set_value (self->session, &carrier, &given, &error))
    hl_quantity_row_set_note (self, error->message, TRUE);
}

static void
entry_activate_cb (GtkEntry *entry, HlQuantityRow *self)
{
  if (hl_quantity_row_is_typing (self))
    hl_quantity_row_commit (self);
  else
    confirm_assumed (self);
}

/* Only what is being typed here is completed: a tie that is merely shown needs no list. */
static void
offer_addresses (HlQuantityRow *self)
{
  if (self->completion == NULL)
    return;
  if (self->is_focused && hl_quantity_row_is_typing (self))
    hl_tie_completion_update (self->completion);
  else
    hl_tie_completion_close (self->completion);
}

static void
entry_changed_cb (GtkEditable *entry, HlQuantityRow *self)
{
  fit_entry (self);
  if (hl_quantity_row_is_typing (self))
    gtk_widget_add_css_class (self->entry, "typing");
  else
    gtk_widget_remove_css_class (self->entry, "typing");
  offer_addresses (self);
}

static gboolean
select_all_idle (gpointer data)
{
  HlQuantityRow *self = data;
  if (self->is_focused && !hl_quantity_row_is_typing (self))
    gtk_editable_select_region (GTK_EDITABLE (self->entry), 0, -1);
  return G_SOURCE_REMOVE;
}

static void
focus_enter_cb (GtkEventControllerFocus *controller, HlQuantityRow *self)
{
  self->is_focused = TRUE;
  gtk_widget_add_css_class (GTK_WIDGET (self), "active");
  if (hl_quantity_row_is_typing (self))
    return;
  show_value (self);
  /* A click places the cursor after the focus has come: select afterwards. */
  g_idle_add_full (G_PRIORITY_HIGH_IDLE, select_all_idle, g_object_ref (self), g_object_unref);
}

static void
focus_leave_cb (GtkEventControllerFocus *controller, HlQuantityRow *self)
{
  self->is_focused = FALSE;
  if (self->completion != NULL)
    hl_tie_completion_close (self->completion);
  gtk_widget_remove_css_class (GTK_WIDGET (self), "active");
  gtk_editable_select_region (GTK_EDITABLE (self->entry), 0, 0);
  if (hl_quantity_row_is_typing (self))
    hl_quantity_row_commit (self);
  else
    restore (self);
  fit_entry (self);
}

static gboolean
key_pressed_cb (GtkEventControllerKey *controller, guint key, guint code, GdkModifierType state, HlQuantityRow *self)
{
  if (self->completion != NULL && hl_tie_completion_key (self->completion, key))
    return GDK_EVENT_STOP;
  switch (key)
    {
    case GDK_KEY_Escape:
      if (!hl_quantity_row_is_typing (self) && !gtk_widget_get_visible (self->note))
        return GDK_EVENT_PROPAGATE;
      restore (self);
      return GDK_EVENT_STOP;
    case GDK_KEY_Down:
    case GDK_KEY_KP_Down:
      if (state & GDK_ALT_MASK)
        return GDK_EVENT_PROPAGATE;
      g_signal_emit_by_name (gtk_widget_get_root (self->entry), "move-focus", GTK_DIR_TAB_FORWARD);
      return GDK_EVENT_STOP;
    case GDK_KEY_Up:
    case GDK_KEY_KP_Up:
      g_signal_emit_by_name (gtk_widget_get_root (self->entry), "move-focus", GTK_DIR_TAB_BACKWARD);
      return GDK_EVENT_STOP;
    default:
      return GDK_EVENT_PROPAGATE;
    }
}

static gboolean
open_origin_cb (GtkWidget *widget, GVariant *args, gpointer data)
{
  HlQuantityRow *self = HL_QUANTITY_ROW (widget);

  gtk_widget_set_visible (self->origin_button, TRUE);
  gtk_menu_button_popup (GTK_MENU_BUTTON (self->origin_button));
  return TRUE;
}

void
hl_quantity_row_start_typing (HlQuantityRow *self, const char *text)
{
  gtk_widget_grab_focus (self->entry);
  gtk_editable_set_text (GTK_EDITABLE (self->entry), text);
  gtk_editable_set_position (GTK_EDITABLE (self->entry), -1);
}

/* --- life --- */

static void
build_name (HlQuantityRow *self)
{
  g_autofree char *label = g_strdup_printf (_("Explain %s"), self->name);

  self->name_label = hl_pane_label (self->name, NULL);
  gtk_label_set_wrap (GTK_LABEL (self->name_label), TRUE);
  gtk_label_set_wrap_mode (GTK_LABEL (self->name_label), PANGO_WRAP_WORD_CHAR);
  gtk_label_set_lines (GTK_LABEL (self->name_label), 2);
  gtk_label_set_ellipsize (GTK_LABEL (self->name_label), PANGO_ELLIPSIZE_END);
  self->name_button = gtk_button_new ();
  gtk_button_set_child (GTK_BUTTON (self->name_button), self->name_label);
  gtk_button_set_has_frame (GTK_BUTTON (self->name_button), FALSE);
  gtk_widget_add_css_class (self->name_button, "name");
  gtk_widget_set_hexpand (self->name_button, TRUE);
  hl_pane_set_accessible (self->name_button, label, NULL);
  gtk_actionable_set_action_name (GTK_ACTIONABLE (self->name_button), "row.explain");
  gtk_box_append (GTK_BOX (self->line), self->name_button);
}

static void
build_entry (HlQuantityRow *self)
{
  GtkEventController *focus = gtk_event_controller_focus_new ();
  GtkEventController *keys = gtk_event_controller_key_new ();

  self->entry = gtk_entry_new ();
  gtk_editable_set_alignment (GTK_EDITABLE (self->entry), 1.0f);
  gtk_editable_set_width_chars (GTK_EDITABLE (self->entry), 2);
  gtk_editable_set_max_width_chars (GTK_EDITABLE (self->entry), 2);
  gtk_entry_set_placeholder_text (GTK_ENTRY (self->entry), "–");
  gtk_widget_set_valign (self->entry, GTK_ALIGN_CENTER);
  g_signal_connect (self->entry, "activate", G_CALLBACK (entry_activate_cb), self);
  g_signal_connect (self->entry, "changed", G_CALLBACK (entry_changed_cb), self);
  g_signal_connect_swapped (self->entry, "notify::cursor-position", G_CALLBACK (offer_addresses), self);
  g_signal_connect (focus, "enter", G_CALLBACK (focus_enter_cb), self);
  g_signal_connect (focus, "leave", G_CALLBACK (focus_leave_cb), self);
  gtk_widget_add_controller (self->entry, focus);
  gtk_event_controller_set_propagation_phase (keys, GTK_PHASE_CAPTURE);
  g_signal_connect (keys, "key-pressed", G_CALLBACK (key_pressed_cb), self);
  gtk_widget_add_controller (self->entry, keys);
  gtk_box_append (GTK_BOX (self->line), self->entry);

  self->unit = hl_pane_label ("", "unit");
  gtk_box_append (GTK_BOX (self->line), self->unit);
}

/* Unit, gaps and the entry's frame lead to the entry too. */
static void
line_pressed_cb (GtkGestureClick *gesture, int n_press, double x, double y, HlQuantityRow *self)
{
  if (!self->is_focused)
    gtk_widget_grab_focus (self->entry);
}

static gboolean
query_tooltip_cb (GtkWidget *line, int x, int y, gboolean by_keyboard, GtkTooltip *tooltip, HlQuantityRow *self)
{
  g_autofree char *help = hl_quantity_row_help (self, "\n");
  g_autofree char *text = g_strdup_printf ("%s\n%s", self->name, help);

  gtk_tooltip_set_text (tooltip, text);
  return TRUE;
}

static void
build (HlQuantityRow *self)
{
  GtkGesture *click = gtk_gesture_click_new ();

  self->line = gtk_box_new (GTK_ORIENTATION_HORIZONTAL, 0);
  gtk_widget_set_has_tooltip (self->line, TRUE);
  g_signal_connect (self->line, "query-tooltip", G_CALLBACK (query_tooltip_cb), self);
  gtk_widget_add_css_class (self->line, "line");
  gtk_widget_set_parent (self->line, GTK_WIDGET (self));
  build_name (self);
  build_entry (self);
  /* What is only read from the solution takes no other value. */
  gtk_editable_set_editable (GTK_EDITABLE (self->entry), !(self->kind->flags & HL_QUANTITY_DERIVED));
  hl_quantity_row_add_origin (self);
  g_signal_connect (click, "pressed", G_CALLBACK (line_pressed_cb), self);
  gtk_widget_add_controller (self->line, GTK_EVENT_CONTROLLER (click));
  hl_quantity_row_add_scrub (self);
  self->completion = hl_tie_completion_new (GTK_WIDGET (self), self->entry, self->session, &self->address);

  self->note = hl_pane_label ("", "note");
  gtk_label_set_wrap (GTK_LABEL (self->note), TRUE);
  gtk_label_set_wrap_mode (GTK_LABEL (self->note), PANGO_WRAP_WORD_CHAR);
  gtk_widget_set_visible (self->note, FALSE);
  gtk_widget_set_parent (self->note, GTK_WIDGET (self));
  hl_quantity_row_add_explanation (self);
}

/* Tab goes from value to value; the origin opens with Alt+Down, the explanation with Alt+Return. */
static gboolean
hl_quantity_row_focus (GtkWidget *widget, GtkDirectionType direction)
{
  HlQuantityRow *self = HL_QUANTITY_ROW (widget);

  if (direction != GTK_DIR_TAB_FORWARD && direction != GTK_DIR_TAB_BACKWARD)
    return GTK_WIDGET_CLASS (hl_quantity_row_parent_class)->focus (widget, direction);
  if (gtk_widget_get_focus_child (widget) != NULL)
    return FALSE;
  return gtk_widget_grab_focus (self->entry);
}

static gboolean
hl_quantity_row_grab_focus (GtkWidget *widget)
{
  return gtk_widget_grab_focus (HL_QUANTITY_ROW (widget)->entry);
}

static void
hl_quantity_row_dispose (GObject *object)
{
  HlQuantityRow *self = HL_QUANTITY_ROW (object);
  GtkWidget *child;

  self->is_retired = TRUE;
  if (self->scrub != NULL)
    hl_scrub_cancel_later (g_steal_pointer (&self->scrub));
  while ((child = gtk_widget_get_first_child (GTK_WIDGET (self))) != NULL)
    gtk_widget_unparent (child);
  g_clear_object (&self->completion);
  g_clear_object (&self->session);
  g_clear_object (&self->actions);
  g_clear_object (&self->origin_action);
  G_OBJECT_CLASS (hl_quantity_row_parent_class)->dispose (object);
}

static void
hl_quantity_row_finalize (GObject *object)
{
  HlQuantityRow *self = HL_QUANTITY_ROW (object);
  g_free (self->name);
  g_free (self->described);
  g_free (self->shown);
  G_OBJECT_CLASS (hl_quantity_row_parent_class)->finalize (object);
}

static void
hl_quantity_row_class_init (HlQuantityRowClass *klass)
{
  GtkWidgetClass *widget_class = GTK_WIDGET_CLASS (klass);
  G_OBJECT_CLASS (klass)->dispose = hl_quantity_row_dispose;
  G_OBJECT_CLASS (klass)->finalize = hl_quantity_row_finalize;
  widget_class->focus = hl_quantity_row_focus;
  widget_class->grab_focus = hl_quantity_row_grab_focus;
  gtk_widget_class_add_binding (widget_class, GDK_KEY_Down, GDK_ALT_MASK, open_origin_cb, NULL);
  gtk_widget_class_add_binding (widget_class, GDK_KEY_KP_Down, GDK_ALT_MASK, open_origin_cb, NULL);
  gtk_widget_class_add_binding_action (widget_class, GDK_KEY_Return, GDK_ALT_MASK, "row.explain", NULL);
  gtk_widget_class_add_binding_action (widget_class, GDK_KEY_KP_Enter, GDK_ALT_MASK, "row.explain", NULL);
  gtk_widget_class_set_css_name (widget_class, "quantity");
  gtk_widget_class_set_layout_manager_type (widget_class, GTK_TYPE_BOX_LAYOUT);
  gtk_widget_class_set_accessible_role (widget_class, GTK_ACCESSIBLE_ROLE_GROUP);
}

static void
hl_quantity_row_init (HlQuantityRow *self)
{
  gtk_orientable_set_orientation (GTK_ORIENTABLE (gtk_widget_get_layout_manager (GTK_WIDGET (self))), GTK_ORIENTATION_VERTICAL);
  self->shown = g_strdup ("");
}

/* 2 of "extraction2.p" and of "group_efficiency2". */
static int
trailing_number (const char *key)
{
  const char *end = strchr (key, '.');
  const char *at = end != NULL ? end : key + strlen (key);

  while (at > key && g_ascii_isdigit (at[-1]))
    at--;
  return atoi (at);
}

GtkWidget *
hl_quantity_row_new (HlSession *session, const HlAddress *address, const char *name)
{
  HlQuantityRow *self = g_object_new (HL_TYPE_QUANTITY_ROW, NULL);
  const HlQuantityKind *kind = hl_plant_quantity_kind (hl_session_plant (session), address);

  g_return_val_if_fail (kind != NULL, GTK_WIDGET (self));
  self->session = g_object_ref (session);
  self->address = *address;
  self->name = g_strdup (name);
  self->kind = kind;
  self->number = trailing_number (address->key);
  build (self);
  hl_quantity_row_update (self);
  return GTK_WIDGET (self);
}

void
hl_quantity_row_update (HlQuantityRow *self)
{
  const HlPlant *plant = hl_session_plant (self->session);

  /* While a quantity goes (undo, another option), the row has nothing to show until it is removed. */
  if (self->is_retired || hl_plant_quantity_kind (plant, &self->address) == NULL)
    return;
  hl_quantity_row_update_variant (self);
  hl_quantity_row_update_origin (self);
  hl_quantity_row_update_scrub (self);
  if (!hl_quantity_row_is_typing (self))
    show_value (self);
  if (gtk_widget_get_visible (self->explanation))
    hl_quantity_row_update_explanation (self);
}

const HlAddress *
hl_quantity_row_address (HlQuantityRow *self)
{
  return &self->address;
}

char *
hl_quantity_row_take_draft (HlQuantityRow *self)
{
  char *draft = hl_quantity_row_is_typing (self) ? g_strdup (gtk_editable_get_text (GTK_EDITABLE (self->entry))) : NULL;
  self->is_retired = TRUE;
  return draft;
}

void
hl_quantity_row_put_draft (HlQuantityRow *self, const char *text)
{
  g_autoptr (GError) error = NULL;
  HlAddress carrier = hl_quantity_row_carrier (self);
  HlValue value;

  gtk_editable_set_text (GTK_EDITABLE (self->entry), text);
  /* Said again, not done: only the engineer's own Return changes the plant. */
  if (!hl_value_parse (hl_session_plant (self->session), &carrier, text, &value, &error))
    hl_quantity_row_set_note (self, error->message, TRUE);
  else
    hl_quantity_row_set_note (self, _("Typed, not yet taken: press Return, or Escape to drop it"), FALSE);
}
