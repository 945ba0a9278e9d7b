/* Files of the window: open, new, save, and the question before unsaved work is lost.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "app/hl-window-private.h"
#include "app/compat.h"
#include "app/hl-confirm.h"
#include "app/hl-settings.h"
#include "plant/i18n.h"
#include "plant/template.h"

typedef void (*Then) (HlWindow *self, gpointer data);

/* What waits for the question about unsaved work, or for the file dialog behind it. */
typedef struct {
  HlWindow      *window;
  Then           then;
  gpointer       data;
  GDestroyNotify free_data;
} Pending;

static void
pending_free (Pending *pending)
{
  if (pending->free_data != NULL)
    pending->free_data (pending->data);
  g_object_unref (pending->window);
  g_free (pending);
}

static void
closed_cb (int button, gpointer data)
{
}

void
hl_window_show_error (HlWindow *self, const char *title, const GError *error)
{
  const char *const buttons[] = { _("Close"), NULL };
  hl_confirm (GTK_WINDOW (self), title, error->message, buttons, closed_cb, NULL);
}

static gboolean
save_to (HlWindow *self, const char *path)
{
  g_autoptr (GError) error = NULL;
  if (hl_session_save (self->session, path, &error))
    {
      g_autofree char *text = g_strdup_printf (_("Saved as %s"), hl_session_path (self->session));
      hl_window_know_file (self);
      g_signal_emit_by_name (self->session, "message", text);
      return TRUE;
    }
  hl_window_show_error (self, _("The plant could not be saved"), error);
  return FALSE;
}

static void
save_chosen_cb (const char *path, gpointer data)
{
  Pending *pending = data;
  if (path != NULL)
    {
      g_autofree char *full = g_str_has_suffix (path, ".heatloom") ? g_strdup (path) : g_strconcat (path, ".heatloom", NULL);
      if (save_to (pending->window, full) && pending->then != NULL)
        pending->then (pending->window, pending->data);
    }
  pending_free (pending);
}

/* A file name from the title: letters and digits, the rest as dashes. */
static char *
proposed_name (HlWindow *self)
{
  g_autofree char *name = hl_session_display_name (self->session);
  g_autofree char *lower = g_utf8_strdown (name, -1);
  GString *text = g_string_new (NULL);
  if (hl_session_path (self->session) != NULL)
    {
      g_string_free (text, TRUE);
      return g_path_get_basename (hl_session_path (self->session));
    }
  for (const char *c = lower; *c != '\0'; c = g_utf8_next_char (c))
    {
      gunichar letter = g_utf8_get_char (c);
      if (g_unichar_isalnum (letter))
        g_string_append_unichar (text, letter);
      else if (text->len > 0 && text->str[text->len - 1] != '-')
        g_string_append_c (text, '-');
    }
  g_string_append (text, ".heatloom");
  return g_string_free (text, FALSE);
}

static void
ask_where_to_save (Pending *pending)
{
  HlWindow *self = pending->window;
  g_autofree char *name = proposed_name (self);
  g_autofree char *folder = hl_session_path (self->session) != NULL ? g_path_get_dirname (hl_session_path (self->session)) : NULL;
  HlFileQuestion question = {
    .title = _("Save the plant"), .accept = _("Save"), .filter_name = _("Heatloom plants"), .pattern = "*.heatloom",
    .folder = folder, .name = name, .is_save = TRUE,
  };
  hl_compat_ask_file (GTK_WINDOW (self), &question, save_chosen_cb, pending);
}

static Pending *
pending_new (HlWindow *self, Then then, gpointer data, GDestroyNotify free_data)
{
  Pending *pending = g_new (Pending, 1);
  pending->window = g_object_ref (self);
  pending->then = then;
  pending->data = data;
  pending->free_data = free_data;
  return pending;
}

static void
save_and_go_on (Pending *pending)
{
  if (save_to (pending->window, NULL) && pending->then != NULL)
    pending->then (pending->window, pending->data);
  pending_free (pending);
}

static void
overwrite_answer_cb (int button, gpointer data)
{
  Pending *pending = data;
  if (button == 2)
    save_and_go_on (pending);
  else if (button == 1)
    ask_where_to_save (pending);
  else
    pending_free (pending);
}

static void
ask_whether_to_overwrite (Pending *pending)
{
  const char *const buttons[] = { _("Cancel"), _("Save as …"), _("Overwrite"), NULL };
  g_autofree char *name = g_path_get_basename (hl_session_path (pending->window->session));
  g_autofree char *title = g_strdup_printf (_("Overwrite “%s”?"), name);
  hl_confirm (GTK_WINDOW (pending->window), title, _("Another program has changed the file since it was read or saved here. Its changes would be lost."),
              buttons, overwrite_answer_cb, pending);
}

/* Saves under the file's own name where that is possible and nobody else's work is lost; else asks.  Takes @pending. */
static void
save_pending (Pending *pending)
{
  HlWindow *self = pending->window;
  if (hl_session_path (self->session) == NULL || hl_window_is_read_only (self))
    ask_where_to_save (pending);
  else if (hl_window_file_state (self) == HL_FILE_CHANGED)
    ask_whether_to_overwrite (pending);
  else
    save_and_go_on (pending);
}

static void
save_answer_cb (int button, gpointer data)
{
  Pending *pending = data;
  if (button == 2)
    {
      save_pending (pending);
      return;
    }
  if (button == 1)
    pending->then (pending->window, pending->data);
  pending_free (pending);
}

void
hl_window_when_safe (HlWindow *self, Then then, gpointer data, GDestroyNotify free_data)
{
  const char *const buttons[] = { _("Cancel"), _("Discard"), _("Save"), NULL };
  Pending *pending = pending_new (self, then, data, free_data);
  g_autofree char *name = NULL, *title = NULL;

  if (!hl_session_is_dirty (self->session))
    {
      then (self, data);
      pending_free (pending);
      return;
    }
  name = hl_session_display_name (self->session);
  title = g_strdup_printf (_("Save the changes to “%s”?"), name);
  hl_confirm (GTK_WINDOW (self), title, _("What was changed since the last saving is lost otherwise."), buttons, save_answer_cb, pending);
}

/* Opening */

HlPlant *
hl_window_new_plant (void)
{
  g_autofree char *id = hl_settings_get_string ("units", "metric");
  g_autoptr (HlPlant) plant = hl_plant_new ();
  HlUnitSet units;
  return hl_unit_set_from_id (id, &units) ? hl_plant_with_units (plant, units) : hl_plant_ref (plant);
}

gboolean
hl_window_open_path (HlWindow *self, const char *path)
{
  g_autoptr (GError) error = NULL;
  if (hl_session_open (self->session, path, &error))
    {
      hl_canvas_fit (self->canvas);
      hl_window_offer_recovery (self);
      return TRUE;
    }
  hl_window_show_error (self, _("The plant could not be opened"), error);
  return FALSE;
}

gboolean
hl_window_open_demo (HlWindow *self, const char *path)
{
  g_autoptr (GError) error = NULL;
  HlDocument *document = hl_document_load (path, &error);
  if (document == NULL)
    {
      hl_window_show_error (self, _("The demo plant could not be opened"), error);
      return FALSE;
    }
  hl_session_reset_document (self->session, document, NULL);
  hl_canvas_fit (self->canvas);
  return TRUE;
}

static void
open_now (HlWindow *self, gpointer data)
{
  hl_window_open_path (self, data);
}

static void
open_demo_now (HlWindow *self, gpointer data)
{
  hl_window_open_demo (self, data);
}

static void
new_now (HlWindow *self, gpointer data)
{
  hl_session_reset (self->session, hl_window_new_plant (), NULL);
  hl_canvas_fit (self->canvas);
}

/* On an empty sheet, as a step that can be undone. */
static void
start_template_cb (GSimpleAction *action, GVariant *parameter, gpointer data)
{
  HlWindow *self = HL_WINDOW (data);
  const HlTemplate *template;
  const char *id;
  int heaters;
  g_variant_get (parameter, "(&si)", &id, &heaters);
  template = hl_template_lookup (id);
  if (template != NULL && hl_plant_n_components (hl_session_plant (self->session)) == 0)
    {
      g_autoptr (HlPlant) plant = hl_template_build (template, heaters);
      g_autofree char *name = g_strdup_printf (_("Start from “%s”"), _(template->name));
      hl_session_apply (self->session, name, hl_plant_with_units (plant, hl_plant_units (hl_session_plant (self->session))), NULL, FALSE);
      hl_canvas_fit (self->canvas);
      gtk_widget_grab_focus (GTK_WIDGET (self->canvas));
    }
}

static void
open_chosen_cb (const char *path, gpointer data)
{
  HlWindow *self = HL_WINDOW (data);
  if (path != NULL)
    hl_window_open_path (self, path);
  g_object_unref (self);
}

static void
ask_what_to_open (HlWindow *self, gpointer data)
{
  g_autofree char *folder = hl_session_path (self->session) != NULL ? g_path_get_dirname (hl_session_path (self->session)) : NULL;
  HlFileQuestion question = {
    .title = _("Open a plant"), .accept = _("Open"), .filter_name = _("Heatloom plants"), .pattern = "*.heatloom", .folder = folder,
  };
  hl_compat_ask_file (GTK_WINDOW (self), &question, open_chosen_cb, g_object_ref (self));
}

/* Actions */

static void
open_cb (GSimpleAction *action, GVariant *parameter, gpointer data)
{
  hl_window_when_safe (HL_WINDOW (data), ask_what_to_open, NULL, NULL);
}

static void
open_path_cb (GSimpleAction *action, GVariant *parameter, gpointer data)
{
  hl_window_when_safe (HL_WINDOW (data), open_now, g_variant_dup_string (parameter, NULL), g_free);
}

static void
open_demo_cb (GSimpleAction *action, GVariant *parameter, gpointer data)
{
  hl_window_when_safe (HL_WINDOW (data), open_demo_now,
                       g_build_filename (hl_data_folder (), "examples", g_variant_get_string (parameter, NULL), NULL), g_free);
}

static void
new_cb (GSimpleAction *action, GVariant *parameter, gpointer data)
{
  hl_window_when_safe (HL_WINDOW (data), new_now, NULL, NULL);
}

static void
save_cb (GSimpleAction *action, GVariant *parameter, gpointer data)
{
  save_pending (pending_new (HL_WINDOW (data), NULL, NULL, NULL));
}

static void
save_as_cb (GSimpleAction *action, GVariant *parameter, gpointer data)
{
  ask_where_to_save (pending_new (HL_WINDOW (data), NULL, NULL, NULL));
}

static void
save_to_cb (GSimpleAction *action, GVariant *parameter, gpointer data)
{
  save_to (HL_WINDOW (data), g_variant_get_string (parameter, NULL));
}

void
hl_window_add_file_actions (HlWindow *self)
{
  static const GActionEntry entries[] = {
    { "open", open_cb },
    { "open-path", open_path_cb, "s" },
    { "open-demo", open_demo_cb, "s" },
    { "new", new_cb },
    { "start-template", start_template_cb, "(si)" },
    { "save", save_cb },
    { "save-as", save_as_cb },
    { "save-to", save_to_cb, "s" },
  };
  g_action_map_add_action_entries (G_ACTION_MAP (self), entries, G_N_ELEMENTS (entries), self);
}
