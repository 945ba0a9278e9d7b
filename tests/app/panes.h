/* What the tests of the panes share: a loop that solves, a window, and finding widgets in it.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#pragma once
#include <locale.h>
#include "app/hl-appearance.h"
#include "app/hl-session.h"

/* A simple steam loop; every number invented. */
static const char loop_text[] =
  "{\"heatloom\": 1, \"title\": \"Loop\", \"units\": \"metric\",\n"
  " \"components\": [\n"
  "  {\"id\": \"B1\", \"kind\": \"heat_input\", \"at\": [8, 12], \"given\": {\"steam.T\": 758.15}, \"assumed\": {\"pressure_loss\": 0.0}},\n"
  "  {\"id\": \"T1\", \"kind\": \"turbine\", \"at\": [20, 8], \"given\": {\"inlet.p\": 6500000.0, \"exhaust.p\": 7000.0},\n"
  "   \"assumed\": {\"isentropic_efficiency\": 0.83, \"mechanical_efficiency\": 0.985}},\n"
  "  {\"id\": \"G1\", \"kind\": \"generator\", \"at\": [30, 8], \"assumed\": {\"efficiency\": 0.98}},\n"
  "  {\"id\": \"C1\", \"kind\": \"condenser\", \"at\": [24, 18], \"assumed\": {\"subcooling\": 0.0}, \"cooling\": \"none\"},\n"
  "  {\"id\": \"P1\", \"kind\": \"pump\", \"at\": [14, 22], \"assumed\": {\"isentropic_efficiency\": 0.75, \"motor_efficiency\": 0.95}}],\n"
  " \"streams\": [\n"
  "  {\"id\": \"1\", \"from\": \"B1.steam\", \"to\": \"T1.inlet\"},\n"
  "  {\"id\": \"2\", \"from\": \"T1.exhaust\", \"to\": \"C1.steam\"},\n"
  "  {\"id\": \"3\", \"from\": \"C1.condensate\", \"to\": \"P1.inlet\"},\n"
  "  {\"id\": \"4\", \"from\": \"P1.outlet\", \"to\": \"B1.feed\"}],\n"
  " \"shafts\": [{\"id\": \"S1\", \"joins\": [\"T1\", \"G1\"]}],\n"
  " \"plant\": {\"given\": {\"net_power\": 12000000.0}, \"assumed\": {\"other_consumption_fraction\": 0.0}}}\n";

static inline HlSession *
loop_session (void)
{
  g_autoptr (GError) error = NULL;
  HlSession *session = hl_session_new ();
  HlPlant *plant = hl_plant_from_json (loop_text, -1, "loop", &error);

  g_assert_no_error (error);
  hl_session_reset (session, plant, NULL);
  return session;
}

static inline void
settle_down (void)
{
  while (g_main_context_iteration (NULL, FALSE))
    ;
}

/* A window of its own with @content in it, drawn once. */
static inline GtkWidget *
window_with (GtkWidget *content)
{
  GtkWidget *window = gtk_window_new ();

  gtk_widget_add_css_class (window, "heatloom");
  gtk_window_set_default_size (GTK_WINDOW (window), 640, 640);
  gtk_window_set_child (GTK_WINDOW (window), content);
  gtk_window_present (GTK_WINDOW (window));
  gtk_test_widget_wait_for_draw (window);
  return window;
}

static inline void
close_window (GtkWidget *window, HlSession *session)
{
  gtk_window_destroy (GTK_WINDOW (window));
  settle_down ();
  g_assert_finalize_object (session);      /* no widget may keep it */
}

/* Walks the visible and hidden widgets under @root, itself included. */
static inline GtkWidget *
find_widget (GtkWidget *root, gboolean (*is_it) (GtkWidget *widget, gconstpointer data), gconstpointer data)
{
  if (is_it (root, data))
    return root;
  for (GtkWidget *child = gtk_widget_get_first_child (root); child != NULL; child = gtk_widget_get_next_sibling (child))
    {
      GtkWidget *found = find_widget (child, is_it, data);
      if (found != NULL)
        return found;
    }
  return NULL;
}

static inline gboolean
is_of_type (GtkWidget *widget, gconstpointer data)
{
  return G_TYPE_CHECK_INSTANCE_TYPE (widget, *(const GType *) data);
}

static inline GtkWidget *
find_type (GtkWidget *root, GType type)
{
  return find_widget (root, is_of_type, &type);
}

static inline gboolean
is_label_with (GtkWidget *widget, gconstpointer data)
{
  return GTK_IS_LABEL (widget) && gtk_widget_get_mapped (widget) && strstr (gtk_label_get_text (GTK_LABEL (widget)), data) != NULL;
}

static inline gboolean
shows_text (GtkWidget *root, const char *text)
{
  settle_down ();
  return find_widget (root, is_label_with, text) != NULL;
}

static inline gboolean
is_button_with (GtkWidget *widget, gconstpointer data)
{
  return GTK_IS_BUTTON (widget) && find_widget (widget, is_label_with, data) != NULL;
}

static inline GtkWidget *
find_button (GtkWidget *root, const char *text)
{
  settle_down ();
  return find_widget (root, is_button_with, text);
}

/* Begins a test program, or ends it at once where there is no display. */
static inline gboolean
test_init (int *argc, char ***argv)
{
  if (g_getenv ("DISPLAY") == NULL && g_getenv ("WAYLAND_DISPLAY") == NULL)
    {
      g_print ("1..0 # SKIP no display\n");
      return FALSE;
    }
  gtk_test_init (argc, argv, NULL);
  setlocale (LC_NUMERIC, "C");
  hl_appearance_start ();
  return TRUE;
}
