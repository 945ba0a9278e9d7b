/* What the tests of whole windows share: the program in this process, acting, waiting, answering questions, a loop drawn by actions.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#pragma once
#include "app/hl-application.h"
#include "app/hl-canvas.h"
#include "app/hl-window.h"

static HlApplication *application;

static inline void
act (HlWindow *window, const char *action, const char *format, ...)
{
  GVariant *parameter = NULL;
  va_list args;
  if (format != NULL)
    {
      va_start (args, format);
      parameter = g_variant_new_va (format, NULL, &args);
      va_end (args);
    }
  g_assert_true (g_action_group_has_action (G_ACTION_GROUP (window), action));
  g_action_group_activate_action (G_ACTION_GROUP (window), action, parameter);
}

static inline gboolean
is_enabled (HlWindow *window, const char *action)
{
  return g_action_group_get_action_enabled (G_ACTION_GROUP (window), action);
}

static inline void
spin (guint milliseconds)
{
  gint64 end = g_get_monotonic_time () + milliseconds * 1000;
  while (g_get_monotonic_time () < end)
    if (!g_main_context_iteration (NULL, FALSE))
      g_usleep (1000);
}

static inline HlWindow *
new_window (void)
{
  HlWindow *window = hl_window_new (GTK_APPLICATION (application), NULL);
  gtk_window_set_default_size (GTK_WINDOW (window), 1280, 720);
  gtk_window_present (GTK_WINDOW (window));
  gtk_test_widget_wait_for_draw (GTK_WIDGET (window));
  return window;
}

/* Discards what is unsaved and waits until the window is gone. */
static inline void
end_window (HlWindow *window)
{
  g_object_add_weak_pointer (G_OBJECT (window), (gpointer *) &window);
  gtk_window_destroy (GTK_WINDOW (window));
  spin (50);
  g_assert_null (window);     /* finalised: nothing keeps a reference */
}

static inline GtkWidget *
find_widget (GtkWidget *root, GType type)
{
  if (G_TYPE_CHECK_INSTANCE_TYPE (root, type))
    return root;
  for (GtkWidget *child = gtk_widget_get_first_child (root); child != NULL; child = gtk_widget_get_next_sibling (child))
    {
      GtkWidget *found = find_widget (child, type);
      if (found != NULL)
        return found;
    }
  return NULL;
}

static inline HlCanvas *
canvas_of (HlWindow *window)
{
  return HL_CANVAS (find_widget (GTK_WIDGET (window), HL_TYPE_CANVAS));
}

static inline HlPlant *
plant_of (HlWindow *window)
{
  return hl_session_plant (hl_window_session (window));
}

static inline void
draw_loop (HlWindow *window)
{
  act (window, "add-component-at", "(sii)", "heat_input", 10, 20);
  act (window, "add-component-at", "(sii)", "turbine", 30, 10);
  act (window, "add-component-at", "(sii)", "generator", 40, 10);
  act (window, "add-component-at", "(sii)", "condenser", 36, 24);
  act (window, "add-component-at", "(sii)", "pump", 20, 30);
  act (window, "connect", "(ssss)", "Q1", "steam", "T1", "inlet");
  act (window, "connect", "(ssss)", "T1", "exhaust", "C1", "steam");
  act (window, "connect", "(ssss)", "C1", "condensate", "P1", "inlet");
  act (window, "connect", "(ssss)", "P1", "outlet", "Q1", "feed");
  act (window, "join-shaft", "(ss)", "T1", "G1");
}

static inline const char *
words_of (GtkWidget *button)
{
  GtkWidget *child = gtk_button_get_child (GTK_BUTTON (button));
  return GTK_IS_LABEL (child) ? gtk_label_get_text (GTK_LABEL (child)) : NULL;
}

static inline GtkWidget *
find_button (GtkWidget *root, const char *label)
{
  if (GTK_IS_BUTTON (root) && g_strcmp0 (words_of (root), label) == 0)
    return root;
  for (GtkWidget *child = gtk_widget_get_first_child (root); child != NULL; child = gtk_widget_get_next_sibling (child))
    {
      GtkWidget *found = find_button (child, label);
      if (found != NULL)
        return found;
    }
  return NULL;
}

/* Presses a button of the dialog over @window. */
static inline void
answer (HlWindow *window, const char *label)
{
  GListModel *toplevels = gtk_window_get_toplevels ();
  spin (30);
  for (guint n = 0; n < g_list_model_get_n_items (toplevels); n++)
    {
      g_autoptr (GtkWindow) dialog = g_list_model_get_item (toplevels, n);
      GtkWidget *button;
      if (gtk_window_get_transient_for (dialog) != GTK_WINDOW (window))
        continue;
      button = find_button (GTK_WIDGET (dialog), label);
      g_assert_nonnull (button);
      g_signal_emit_by_name (button, "clicked");
      spin (30);
      return;
    }
  g_error ("no dialog with a button “%s”", label);
}

static inline GtkEventController *
primary_drag (HlCanvas *canvas)
{
  g_autoptr (GListModel) controllers = gtk_widget_observe_controllers (GTK_WIDGET (canvas));
  for (guint n = 0; n < g_list_model_get_n_items (controllers); n++)
    {
      g_autoptr (GtkEventController) controller = g_list_model_get_item (controllers, n);
      if (g_strcmp0 (gtk_event_controller_get_name (controller), "primary-drag") == 0)
        return controller;
    }
  g_assert_not_reached ();
}

static inline void
drag (HlCanvas *canvas, double x, double y, double to_x, double to_y)
{
  GtkEventController *gesture = primary_drag (canvas);
  g_signal_emit_by_name (gesture, "drag-begin", x, y);
  for (int n = 1; n <= 10; n++)
    g_signal_emit_by_name (gesture, "drag-update", (to_x - x) * n / 10, (to_y - y) * n / 10);
  g_signal_emit_by_name (gesture, "drag-end", to_x - x, to_y - y);
}

static inline void
locate (HlCanvas *canvas, const char *id, const char *port, double *x, double *y)
{
  g_assert_true (hl_canvas_locate (canvas, id, port, x, y));
}

/* Begins a test program, or ends it at once where there is no display. */
static inline gboolean
windows_init (int *argc, char ***argv)
{
  if (g_getenv ("DISPLAY") == NULL)
    {
      g_print ("1..0 # SKIP no display\n");
      return FALSE;
    }
  hl_application_prepare_process ();
  gtk_test_init (argc, argv, NULL);
  application = hl_application_new (G_APPLICATION_NON_UNIQUE);
  g_assert_true (g_application_register (G_APPLICATION (application), NULL, NULL));
  return TRUE;
}

static inline int
windows_run (void)
{
  int result = g_test_run ();
  g_object_unref (application);
  return result;
}
