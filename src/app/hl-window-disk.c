/* The file behind a window as the disk has it: changed by others, read-only, dragged in, opened lately.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "app/hl-window-private.h"
#include "app/hl-notice.h"
#include "app/hl-settings.h"
#include "plant/i18n.h"
#include <glib/gstdio.h>

#define MIME_TYPE "application/x-heatloom+json"

/* --- what the disk says ----------------------------------------------------------- */

gboolean
hl_window_is_read_only (HlWindow *self)
{
  const char *path = hl_session_path (self->session);
  g_autofree char *folder = NULL;
  GStatBuf about;
  if (path == NULL || g_stat (path, &about) != 0)
    return FALSE;
  folder = g_path_get_dirname (path);
  /* Who may do everything is still told by the mode what should stay as it is; saving puts a new file in the folder. */
  return (about.st_mode & 0222) == 0 || g_access (path, W_OK) != 0 || g_access (folder, W_OK) != 0;
}

HlFileState
hl_window_file_state (HlWindow *self)
{
  return hl_file_watch_state (self->watch);
}

static void
changed_on_disk_cb (HlFileState state, gpointer data)
{
  static const HlNoticeButton changed[] = { { N_("Read it again"), "win.revert" }, { N_("Keep mine"), NULL }, { NULL, NULL } };
  static const HlNoticeButton removed[] = { { N_("Save"), "win.save" }, { N_("Keep mine"), NULL }, { NULL, NULL } };
  HlWindow *self = HL_WINDOW (data);
  HlNoticeButton buttons[3] = { { NULL, NULL } };
  const HlNoticeButton *chosen = state == HL_FILE_REMOVED ? removed : changed;
  g_autofree char *name = g_path_get_basename (hl_session_path (self->session));
  g_autofree char *text = g_strdup_printf (state == HL_FILE_REMOVED ? _("“%s” has been removed or renamed by another program.")
                                                                   : _("“%s” has been changed by another program."), name);
  if (state == HL_FILE_SAME)
    {
      hl_notice_hide (self->notice_bin);
      return;
    }
  for (guint n = 0; n < 2; n++)
    buttons[n] = (HlNoticeButton) { _(chosen[n].label), chosen[n].action };
  hl_notice_show (self->notice_bin, text, buttons);
}

static void
tell_read_only (HlWindow *self)
{
  const HlNoticeButton buttons[] = { { _("Save as …"), "win.save-as" }, { _("Close"), NULL }, { NULL, NULL } };
  g_autofree char *name = g_path_get_basename (hl_session_path (self->session));
  g_autofree char *text = g_strdup_printf (_("“%s” may only be read. Saving asks for another place."), name);
  hl_notice_show (self->notice_bin, text, buttons);
}

static void
remember_as_recent (const char *path)
{
  g_autoptr (GFile) file = g_file_new_for_path (path);
  g_autofree char *uri = g_file_get_uri (file);
  g_autofree char *command = g_strdup_printf ("%s %%u", g_get_prgname ());
  GtkRecentData data = { .mime_type = (char *) MIME_TYPE, .app_name = (char *) g_get_prgname (), .app_exec = command };
  gtk_recent_manager_add_full (gtk_recent_manager_get_default (), uri, &data);
}

void
hl_window_know_file (HlWindow *self)
{
  const char *path = hl_session_path (self->session);
  hl_file_watch_follow (self->watch, path);
  hl_notice_hide (self->notice_bin);
  if (path == NULL)
    return;
  remember_as_recent (path);
  if (hl_window_is_read_only (self))
    tell_read_only (self);
}

static void
file_changed_cb (HlWindow *self)
{
  const char *path = hl_session_path (self->session);
  if (g_strcmp0 (path, self->known_path) == 0)
    return;
  g_free (self->known_path);
  self->known_path = g_strdup (path);
  hl_window_know_file (self);
}

/* --- the first hint --------------------------------------------------------------------- */

static void
no_demo_hint_cb (GSimpleAction *action, GVariant *parameter, gpointer data)
{
  hl_settings_set_bool ("demo-hint", FALSE);
}

void
hl_window_show_demo_hint (HlWindow *self)
{
  const HlNoticeButton buttons[] = { { _("New plant"), "win.new" }, { _("Do not say this again"), "win.no-demo-hint" }, { NULL, NULL } };
  if (hl_settings_get_bool ("demo-hint", TRUE) && hl_plant_n_components (hl_session_plant (self->session)) > 0)
    hl_notice_show (self->notice_bin, _("A demo plant: change any value at the right, and everything follows. Your own work begins with a new plant."), buttons);
}

/* --- back to the file --------------------------------------------------------------- */

static void
revert_cb (GSimpleAction *action, GVariant *parameter, gpointer data)
{
  HlWindow *self = HL_WINDOW (data);
  g_autoptr (GError) error = NULL;
  if (!hl_session_revert (self->session, &error))
    {
      hl_window_show_error (self, _("The file could not be read again"), error);
      return;
    }
  hl_window_know_file (self);
  g_signal_emit_by_name (self->session, "message", _("As the file has it; undo brings back what was here before"));
}

/* --- files that are dropped on the window ---------------------------------------------- */

static gboolean
drop_cb (GtkDropTarget *target, const GValue *value, double x, double y, gpointer data)
{
  HlWindow *self = HL_WINDOW (data);
  g_autoptr (GPtrArray) others = g_ptr_array_new ();
  gboolean is_first = TRUE;
  for (GSList *l = g_value_get_boxed (value); l != NULL; l = l->next)
    {
      g_autofree char *path = g_file_get_path (l->data);
      if (path == NULL || !is_first)
        g_ptr_array_add (others, l->data);
      else
        gtk_widget_activate_action (GTK_WIDGET (self), "win.open-path", "s", path);
      is_first = FALSE;
    }
  if (others->len > 0)
    g_application_open (G_APPLICATION (gtk_window_get_application (GTK_WINDOW (self))), (GFile **) others->pdata, (int) others->len, "");
  return !is_first;
}

/* --- files opened lately -------------------------------------------------------------- */

static int
latest_first (gconstpointer a, gconstpointer b)
{
  return g_date_time_compare (gtk_recent_info_get_visited ((GtkRecentInfo *) b), gtk_recent_info_get_visited ((GtkRecentInfo *) a));
}

char **
hl_window_recent_paths (guint most)
{
  GList *infos = g_list_sort (gtk_recent_manager_get_items (gtk_recent_manager_get_default ()), latest_first);
  g_autoptr (GStrvBuilder) paths = g_strv_builder_new ();
  guint n = 0;
  for (GList *l = infos; l != NULL && n < most; l = l->next)
    {
      g_autofree char *path = NULL;
      if (g_strcmp0 (gtk_recent_info_get_mime_type (l->data), MIME_TYPE) != 0 || !gtk_recent_info_exists (l->data))
        continue;
      path = g_filename_from_uri (gtk_recent_info_get_uri (l->data), NULL, NULL);
      if (path == NULL)
        continue;
      g_strv_builder_add (paths, path);
      n++;
    }
  g_list_free_full (infos, (GDestroyNotify) gtk_recent_info_unref);
  return g_strv_builder_end (paths);
}

void
hl_window_watch_disk (HlWindow *self)
{
  static const GActionEntry entries[] = { { "revert", revert_cb }, { "no-demo-hint", no_demo_hint_cb } };
  GtkDropTarget *target = gtk_drop_target_new (GDK_TYPE_FILE_LIST, GDK_ACTION_COPY);
  g_signal_connect (target, "drop", G_CALLBACK (drop_cb), self);
  gtk_widget_add_controller (GTK_WIDGET (self), GTK_EVENT_CONTROLLER (target));
  g_action_map_add_action_entries (G_ACTION_MAP (self), entries, G_N_ELEMENTS (entries), self);
  self->watch = hl_file_watch_new (changed_on_disk_cb, self);
  g_signal_connect_object (self->session, "file-changed", G_CALLBACK (file_changed_cb), self, G_CONNECT_SWAPPED);
  file_changed_cb (self);
}

void
hl_window_unwatch_disk (HlWindow *self)
{
  g_clear_pointer (&self->watch, hl_file_watch_free);
  g_clear_pointer (&self->known_path, g_free);
}
