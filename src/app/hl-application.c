/* The program: command line, look, shortcuts, windows.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "app/hl-application.h"
#include "app/hl-appearance.h"
#include "app/hl-settings.h"
#include "app/hl-trace.h"
#include "app/hl-window.h"
#include "plant/i18n.h"
#include <locale.h>

#define DEMO_PLANT "tallow-fen.heatloom"

struct _HlApplication {
  GtkApplication parent_instance;
};

G_DEFINE_FINAL_TYPE (HlApplication, hl_application, GTK_TYPE_APPLICATION)

static const struct { const char *action; const char *keys[4]; } shortcuts[] = {
  { "win.open", { "<Control>o" } },
  { "win.new", { "<Control>n" } },
  { "app.new-window", { "<Control><Shift>n" } },
  { "win.save", { "<Control>s" } },
  { "win.save-as", { "<Control><Shift>s" } },
  { "win.export", { "<Control>e" } },
  { "win.variant-menu", { "F4" } },
  { "win.variant-next", { "<Control>Page_Down" } },
  { "win.variant-previous", { "<Control>Page_Up" } },
  { "win.undo", { "<Control>z" } },
  { "win.redo", { "<Control><Shift>z", "<Control>y" } },
  { "win.zoom-in", { "<Control>plus", "<Control>equal", "<Control>KP_Add" } },
  { "win.zoom-out", { "<Control>minus", "<Control>KP_Subtract" } },
  { "win.zoom-fit", { "<Control>0", "<Control>KP_0" } },
  { "win.diagram-beside", { "F8" } },
  { "win.look-next", { "F6" } },
  { "win.shortcuts", { "<Control>question", "F1" } },
  { "win.close-asking", { "<Control>w" } },
  { "app.quit", { "<Control>q" } },
};

/* The demo plant as a new one without a file.  Read before there is a window, so that the window is filled once. */
static HlSession *
demo_session (void)
{
  g_autofree char *path = g_build_filename (hl_data_folder (), "examples", DEMO_PLANT, NULL);
  HlSession *session = hl_session_new ();
  HlDocument *document = hl_document_load (path, NULL);
  if (document != NULL)
    hl_session_reset_document (session, document, NULL);
  return session;
}

static void
hl_application_activate (GApplication *application)
{
  GtkWindow *present = gtk_application_get_active_window (GTK_APPLICATION (application));
  if (present == NULL)
    {
      g_autoptr (HlSession) session = demo_session ();
      present = GTK_WINDOW (hl_window_new (GTK_APPLICATION (application), session));
      hl_window_show_demo_hint (HL_WINDOW (present));
      gtk_window_present (present);
      hl_window_offer_recovery (HL_WINDOW (present));
    }
  else
    gtk_window_present (present);
}

/* The window that shows a file already. */
static GtkWindow *
window_of (GtkApplication *application, const char *path)
{
  for (GList *l = gtk_application_get_windows (application); l != NULL && path != NULL; l = l->next)
    if (HL_IS_WINDOW (l->data) && g_strcmp0 (hl_session_path (hl_window_session (l->data)), path) == 0)
      return l->data;
  return NULL;
}

static void
hl_application_open (GApplication *application, GFile **files, int n_files, const char *hint)
{
  for (int n = 0; n < n_files; n++)
    {
      g_autofree char *path = g_file_get_path (files[n]);
      GtkWindow *present = window_of (GTK_APPLICATION (application), path);
      g_autoptr (HlSession) session = NULL;
      gboolean is_open;
      HlWindow *window;
      if (present != NULL)
        {
          gtk_window_present (present);
          continue;
        }
      session = hl_session_new ();
      is_open = path != NULL && hl_session_open (session, path, NULL);
      window = hl_window_new (GTK_APPLICATION (application), session);
      gtk_window_present (GTK_WINDOW (window));
      if (path != NULL && !is_open)
        hl_window_open_path (window, path);     /* once more, to say in the window what is wrong */
      else if (is_open)
        hl_window_offer_recovery (window);
    }
}

static int
hl_application_handle_local_options (GApplication *application, GVariantDict *options)
{
  if (g_variant_dict_contains (options, "version"))
    {
      g_print ("heatloom %s\n", HL_VERSION);
      return 0;
    }
  return -1;
}

static void
new_window_cb (GSimpleAction *action, GVariant *parameter, gpointer data)
{
  g_autoptr (HlSession) session = hl_session_new ();
  hl_session_reset (session, hl_window_new_plant (), NULL);
  gtk_window_present (GTK_WINDOW (hl_window_new (GTK_APPLICATION (data), session)));
}

/* Closes window by window, so that each can ask about unsaved work. */
static void
quit_cb (GSimpleAction *action, GVariant *parameter, gpointer data)
{
  g_autoptr (GList) windows = g_list_copy (gtk_application_get_windows (GTK_APPLICATION (data)));
  for (GList *l = windows; l != NULL; l = l->next)
    if (HL_IS_WINDOW (l->data))
      gtk_window_close (l->data);
}

static void
add_shortcuts (GtkApplication *application)
{
  for (guint n = 0; n < G_N_ELEMENTS (shortcuts); n++)
    gtk_application_set_accels_for_action (application, shortcuts[n].action, shortcuts[n].keys);
}

static void
hl_application_startup (GApplication *application)
{
  static const GActionEntry entries[] = { { "quit", quit_cb }, { "new-window", new_window_cb } };
  g_autofree char *look = NULL;

  g_set_prgname ("local.heatloom.Heatloom");    /* the desktop file's name: shells match windows by it */
  G_APPLICATION_CLASS (hl_application_parent_class)->startup (application);
  hl_appearance_start ();
  look = hl_settings_get_string ("look", "system");
  hl_appearance_set (hl_appearance_from_id (look));
  gtk_window_set_default_icon_name ("local.heatloom.Heatloom");
  g_action_map_add_action_entries (G_ACTION_MAP (application), entries, G_N_ELEMENTS (entries), application);
  add_shortcuts (GTK_APPLICATION (application));
}

static void
hl_application_init (HlApplication *self)
{
  static const GOptionEntry options[] = {
    { "version", 0, 0, G_OPTION_ARG_NONE, NULL, N_("Print the version and exit"), NULL },
    { NULL }
  };
  g_application_add_main_option_entries (G_APPLICATION (self), options);
  g_application_set_option_context_parameter_string (G_APPLICATION (self), _("[FILE]"));
  g_application_set_option_context_summary (G_APPLICATION (self), _("Heatloom, an editor for thermal cycles."));
}

static void
hl_application_class_init (HlApplicationClass *class)
{
  GApplicationClass *application = G_APPLICATION_CLASS (class);
  application->activate = hl_application_activate;
  application->open = hl_application_open;
  application->startup = hl_application_startup;
  application->handle_local_options = hl_application_handle_local_options;
}

HlApplication *
hl_application_new (GApplicationFlags flags)
{
  return g_object_new (HL_TYPE_APPLICATION, "application-id", "local.heatloom.Heatloom",
                       "flags", G_APPLICATION_HANDLES_OPEN | flags, NULL);
}

/* The cairo renderer starts in half the time and a third of the memory where OpenGL is done in software; a machine with
 * a render node has a GPU and keeps GTK's own choice. */
static void
choose_renderer (void)
{
  if (g_getenv ("GSK_RENDERER") != NULL || g_getenv ("GDK_DEBUG") != NULL)
    return;
  if (g_file_test ("/dev/dri/renderD128", G_FILE_TEST_EXISTS))
    return;
  g_setenv ("GSK_RENDERER", "cairo", TRUE);
  g_setenv ("GDK_DEBUG", "gl-disable", TRUE);
}

void
hl_application_prepare_process (void)
{
  const char *folder = g_getenv ("APP_LOCALEDIR");
  setlocale (LC_ALL, "");
  setlocale (LC_NUMERIC, "C");          /* numbers print and parse alike everywhere */
  gtk_disable_setlocale ();
  bindtextdomain (GETTEXT_PACKAGE, folder != NULL ? folder : HL_LOCALEDIR);
  bind_textdomain_codeset (GETTEXT_PACKAGE, "UTF-8");
  textdomain (GETTEXT_PACKAGE);
  choose_renderer ();
}
