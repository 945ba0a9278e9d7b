/* Variants in the window: the chooser in the header bar, and what can be done with variants.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "app/hl-window-private.h"
#include "app/compat.h"
#include "app/hl-ask-name.h"
#include "app/hl-pane.h"
#include "app/hl-trace.h"
#include "plant/i18n.h"

static HlDocument *
document_of (HlWindow *self)
{
  return hl_session_document (self->session);
}

static const char *
name_of (HlWindow *self, int variant)
{
  return variant == HL_DOCUMENT_BASE ? C_("variant", "Base") : hl_document_variant_name (document_of (self), variant);
}

static void
say (HlWindow *self, const char *text)
{
  g_signal_emit_by_name (self->session, "message", text);
}

/* Takes the step's name and the document; NULL with @error: says why not. */
static void
apply (HlWindow *self, char *step, HlDocument *document, int variant, GError *error)
{
  if (document != NULL)
    hl_session_apply_document (self->session, step, document, variant);
  else
    say (self, error->message);
  g_clear_error (&error);
  g_free (step);
}

/* --- looking --- */

static void
show_cb (GSimpleAction *action, GVariant *target, gpointer data)
{
  HlWindow *self = HL_WINDOW (data);
  const char *name = g_variant_get_string (target, NULL);
  hl_session_show_variant (self->session, *name == '\0' ? HL_DOCUMENT_BASE : hl_document_find_variant (document_of (self), name));
}

static void
step_through (HlWindow *self, int step)
{
  int n = (int) hl_document_n_variants (document_of (self)) + 1;
  int column = hl_session_variant (self->session) + 1;
  hl_session_show_variant (self->session, (column + step + n) % n - 1);
  say (self, name_of (self, hl_session_variant (self->session)));
}

static void
next_cb (GSimpleAction *action, GVariant *parameter, gpointer data)
{
  step_through (HL_WINDOW (data), 1);
}

static void
previous_cb (GSimpleAction *action, GVariant *parameter, gpointer data)
{
  step_through (HL_WINDOW (data), -1);
}

/* --- making and naming --- */

typedef struct {
  HlWindow *window;
  int       variant;      /* duplicated or renamed; HL_DOCUMENT_BASE: a new one */
  gboolean  is_rename;
} Naming;

static void
naming_free (gpointer data)
{
  Naming *naming = data;
  g_object_unref (naming->window);
  g_free (naming);
}

static HlDocument *
named (const Naming *naming, const char *name, GError **error)
{
  HlDocument *document = document_of (naming->window);
  return naming->is_rename ? hl_document_with_name (document, naming->variant, name, error)
                           : hl_document_with_variant (document, name, naming->variant, error);
}

static gboolean
check_name (const char *name, gpointer data, GError **error)
{
  g_autoptr (HlDocument) document = named (data, name, error);
  return document != NULL;
}

static void
name_given (const char *name, gpointer data)
{
  const Naming *naming = data;
  GError *error = NULL;
  HlDocument *document = named (naming, name, &error);
  int variant = document != NULL ? hl_document_find_variant (document, name) : HL_DOCUMENT_BASE;
  char *step = g_strdup_printf (naming->is_rename ? _("Rename to “%s”") : _("Add variant “%s”"), name);
  apply (naming->window, step, document, variant, error);
}

static Naming *
naming_new (HlWindow *self, int variant, gboolean is_rename)
{
  Naming *naming = g_new (Naming, 1);
  *naming = (Naming) { g_object_ref (self), variant, is_rename };
  return naming;
}

static void
ask (HlWindow *self, const char *title, const char *accept, const char *proposal, Naming *naming)
{
  hl_ask_name (GTK_WINDOW (self), title, accept, proposal, check_name, name_given, naming, naming_free);
}

static void
new_cb (GSimpleAction *action, GVariant *parameter, gpointer data)
{
  HlWindow *self = HL_WINDOW (data);
  g_autofree char *proposal = hl_document_free_name (document_of (self), _("what-if"));
  ask (self, _("Name of the new variant"), _("Make it"), proposal, naming_new (self, HL_DOCUMENT_BASE, FALSE));
}

static void
duplicate_cb (GSimpleAction *action, GVariant *parameter, gpointer data)
{
  HlWindow *self = HL_WINDOW (data);
  int variant = hl_session_variant (self->session);
  g_autofree char *proposal = hl_document_free_name (document_of (self), name_of (self, variant));
  ask (self, _("Name of the copy"), _("Duplicate"), proposal, naming_new (self, variant, FALSE));
}

static void
rename_cb (GSimpleAction *action, GVariant *parameter, gpointer data)
{
  HlWindow *self = HL_WINDOW (data);
  int variant = hl_session_variant (self->session);
  ask (self, _("New name of the variant"), _("Rename"), name_of (self, variant), naming_new (self, variant, TRUE));
}

/* The same without asking, for tests and scripts of the window. */
static void
new_named_cb (GSimpleAction *action, GVariant *name, gpointer data)
{
  Naming *naming = naming_new (HL_WINDOW (data), HL_DOCUMENT_BASE, FALSE);
  name_given (g_variant_get_string (name, NULL), naming);
  naming_free (naming);
}

static void
rename_to_cb (GSimpleAction *action, GVariant *name, gpointer data)
{
  HlWindow *self = HL_WINDOW (data);
  Naming *naming;
  if (hl_session_variant (self->session) == HL_DOCUMENT_BASE)
    return;
  naming = naming_new (self, hl_session_variant (self->session), TRUE);
  name_given (g_variant_get_string (name, NULL), naming);
  naming_free (naming);
}

/* --- order, promotion, end --- */

static void
delete_cb (GSimpleAction *action, GVariant *parameter, gpointer data)
{
  HlWindow *self = HL_WINDOW (data);
  int variant = hl_session_variant (self->session);
  if (variant != HL_DOCUMENT_BASE)
    apply (self, g_strdup_printf (_("Delete variant “%s”"), name_of (self, variant)), hl_document_without (document_of (self), variant),
           HL_DOCUMENT_BASE, NULL);
}

static void
promote_cb (GSimpleAction *action, GVariant *parameter, gpointer data)
{
  HlWindow *self = HL_WINDOW (data);
  int variant = hl_session_variant (self->session);
  if (variant != HL_DOCUMENT_BASE)
    apply (self, g_strdup_printf (_("Make “%s” the base"), name_of (self, variant)), hl_document_promoted (document_of (self), variant),
           HL_DOCUMENT_BASE, NULL);
}

static void
move_variant (HlWindow *self, int by)
{
  int variant = hl_session_variant (self->session), place = variant + by;
  if (variant == HL_DOCUMENT_BASE || place < 0 || place >= (int) hl_document_n_variants (document_of (self)))
    return;
  apply (self, g_strdup_printf (_("Move variant “%s”"), name_of (self, variant)), hl_document_with_order (document_of (self), variant, place),
         place, NULL);
}

static void
earlier_cb (GSimpleAction *action, GVariant *parameter, gpointer data)
{
  move_variant (HL_WINDOW (data), -1);
}

static void
later_cb (GSimpleAction *action, GVariant *parameter, gpointer data)
{
  move_variant (HL_WINDOW (data), 1);
}

/* --- the chooser --- */

static void
append_variant (GMenu *menu, const char *label, const char *target)
{
  GMenuItem *item = g_menu_item_new (label, NULL);
  g_menu_item_set_action_and_target_value (item, "win.variant", g_variant_new_string (target));
  g_menu_append_item (menu, item);
  g_object_unref (item);
}

/* Underscores in a name are no mnemonics. */
static char *
menu_label (const char *name)
{
  GString *text = g_string_new (name);
  g_string_replace (text, "_", "__", 0);
  return g_string_free (text, FALSE);
}

static GMenu *
append_section (GMenu *menu)
{
  GMenu *section = g_menu_new ();
  g_menu_append_section (menu, NULL, G_MENU_MODEL (section));
  g_object_unref (section);
  return section;
}

static void
append_compared (GMenu *menu, const char *label, const char *target)
{
  GMenuItem *item = g_menu_item_new (label, NULL);
  g_menu_item_set_action_and_target_value (item, "win.compare-variant", g_variant_new_string (target));
  g_menu_append_item (menu, item);
  g_object_unref (item);
}

/* On the canvas: with the others, or with another file. */
static void
append_compare (HlWindow *self, GMenu *menu)
{
  HlDocument *document = document_of (self);
  g_autoptr (GMenu) others = g_menu_new ();
  if (hl_session_variant (self->session) != HL_DOCUMENT_BASE)
    append_compared (others, C_("variant", "Base"), "");
  for (guint n = 0; n < hl_document_n_variants (document); n++)
    {
      g_autofree char *label = menu_label (hl_document_variant_name (document, (int) n));
      if ((int) n != hl_session_variant (self->session))
        append_compared (others, label, hl_document_variant_name (document, (int) n));
    }
  g_menu_append (others, _("Another file …"), "win.compare-file");
  g_menu_append_submenu (menu, _("Compare on the canvas with"), G_MENU_MODEL (others));
  g_menu_append (menu, _("End the comparison"), "win.compare-end");
}

static void
create_popup_cb (GtkMenuButton *button, gpointer data)
{
  HlWindow *self = HL_WINDOW (data);
  HlDocument *document = document_of (self);
  g_autoptr (GMenu) menu = g_menu_new ();
  GMenu *section = append_section (menu);
  append_variant (section, C_("variant", "Base"), "");
  for (guint n = 0; n < hl_document_n_variants (document); n++)
    {
      g_autofree char *label = menu_label (hl_document_variant_name (document, (int) n));
      append_variant (section, label, hl_document_variant_name (document, (int) n));
    }
  section = append_section (menu);
  g_menu_append (section, _("New variant …"), "win.variant-new");
  g_menu_append (section, _("Duplicate …"), "win.variant-duplicate");
  section = append_section (menu);
  g_menu_append (section, _("Rename …"), "win.variant-rename");
  g_menu_append (section, _("Further up"), "win.variant-earlier");
  g_menu_append (section, _("Further down"), "win.variant-later");
  g_menu_append (section, _("Make it the base"), "win.variant-promote");
  g_menu_append (section, _("Delete"), "win.variant-delete");
  section = append_section (menu);
  g_menu_append (section, _("All in a table"), "win.show-variants");
  append_compare (self, section);
  gtk_menu_button_set_popover (button, gtk_popover_menu_new_from_model (G_MENU_MODEL (menu)));
  hl_trace ("variants listed");
}

static void
menu_cb (GSimpleAction *action, GVariant *parameter, gpointer data)
{
  gtk_menu_button_popup (HL_WINDOW (data)->variant_button);
}

static void
show_table_cb (GSimpleAction *action, GVariant *parameter, gpointer data)
{
  gtk_stack_set_visible_child_name (HL_WINDOW (data)->stack, "variants");
}

static GSimpleAction *
action_named (HlWindow *self, const char *name)
{
  return G_SIMPLE_ACTION (g_action_map_lookup_action (G_ACTION_MAP (self), name));
}

void
hl_window_update_variants (HlWindow *self)
{
  static const char *const of_variant[] = { "variant-rename", "variant-rename-to", "variant-earlier", "variant-later", "variant-promote", "variant-delete" };
  HlDocument *document = document_of (self);
  int variant = hl_session_variant (self->session), n = (int) hl_document_n_variants (document);
  const GPtrArray *unapplied = hl_document_unapplied (document, variant);
  g_autofree char *tip = NULL, *label = g_strdup_printf (_("Variant: %s"), name_of (self, variant));

  gtk_label_set_text (self->variant_label, name_of (self, variant));
  if (variant == HL_DOCUMENT_BASE)
    tip = g_strdup (n > 0 ? _("The base; edits reach all variants that do not say otherwise (F4)") : _("Variants: what-ifs of this plant (F4)"));
  else if (unapplied->len > 0)
    {
      const HlUnapplied *first = unapplied->pdata[0];
      tip = g_strdup_printf (ngettext_hl ("%u change does not apply: %s: %s", "%u changes do not apply, the first: %s: %s", unapplied->len),
                             unapplied->len, hl_change_where (first->change), first->why);
    }
  else
    tip = g_strdup_printf (ngettext_hl ("%u change from the base; edits go here (F4)", "%u changes from the base; edits go here (F4)",
                                        hl_document_changes (document, variant)->len), hl_document_changes (document, variant)->len);
  hl_compat_set_tip (GTK_WIDGET (self->variant_button), tip);
  hl_pane_set_accessible (GTK_WIDGET (self->variant_button), label, tip);
  gtk_widget_remove_css_class (GTK_WIDGET (self->variant_button), "in-variant");
  gtk_widget_remove_css_class (GTK_WIDGET (self->variant_button), "in-doubt");
  if (variant != HL_DOCUMENT_BASE)
    gtk_widget_add_css_class (GTK_WIDGET (self->variant_button), "in-variant");
  if (unapplied->len > 0)
    gtk_widget_add_css_class (GTK_WIDGET (self->variant_button), "in-doubt");
  for (guint i = 0; i < G_N_ELEMENTS (of_variant); i++)
    g_simple_action_set_enabled (action_named (self, of_variant[i]), variant != HL_DOCUMENT_BASE);
  g_simple_action_set_enabled (action_named (self, "variant-next"), n > 0);
  g_simple_action_set_enabled (action_named (self, "variant-previous"), n > 0);
  g_simple_action_set_enabled (action_named (self, "variant-earlier"), variant > 0);
  g_simple_action_set_enabled (action_named (self, "variant-later"), variant >= 0 && variant < n - 1);
  g_simple_action_set_state (action_named (self, "variant"), g_variant_new_string (hl_document_variant_name (document, variant)));
}

void
hl_window_add_variant_actions (HlWindow *self)
{
  static const GActionEntry entries[] = {
    { "variant", NULL, "s", "''", show_cb },
    { "variant-next", next_cb },
    { "variant-previous", previous_cb },
    { "variant-new", new_cb },
    { "variant-new-named", new_named_cb, "s" },
    { "variant-duplicate", duplicate_cb },
    { "variant-rename", rename_cb },
    { "variant-rename-to", rename_to_cb, "s" },
    { "variant-earlier", earlier_cb },
    { "variant-later", later_cb },
    { "variant-promote", promote_cb },
    { "variant-delete", delete_cb },
    { "variant-menu", menu_cb },
    { "show-variants", show_table_cb },
  };
  g_action_map_add_action_entries (G_ACTION_MAP (self), entries, G_N_ELEMENTS (entries), self);
  gtk_menu_button_set_create_popup_func (self->variant_button, create_popup_cb, self, NULL);
}
