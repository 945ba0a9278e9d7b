/* Beginning: what an empty sheet offers, and components by their name.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "windows.h"
#include "app/hl-settings.h"
#include "plant/template.h"

static gboolean
offers (HlWindow *window, const char *text)
{
  GtkWidget *button = find_button (GTK_WIDGET (window), text);
  return button != NULL && gtk_widget_get_mapped (button);
}

static void
test_an_empty_sheet_offers_templates (void)
{
  HlWindow *window = new_window ();
  spin (30);
  g_assert_true (offers (window, "Simple loop"));
  g_signal_emit_by_name (find_button (GTK_WIDGET (window), "Reheat"), "clicked");
  spin (30);
  g_assert_true (hl_solution_is_solved (hl_session_solution (hl_window_session (window))));
  g_assert_cmpuint (hl_plant_n_components (plant_of (window)), ==, 12);      /* four heaters, unless another number was set */
  g_assert_cmpstr (hl_session_undo_name (hl_window_session (window)), ==, "Start from “Reheat”");
  g_assert_false (offers (window, "Simple loop"));
  act (window, "start-template", "(si)", "simple", 0);                       /* not over a drawing */
  g_assert_cmpuint (hl_plant_n_components (plant_of (window)), ==, 12);
  act (window, "undo", NULL);
  spin (30);
  g_assert_true (offers (window, "Simple loop"));
  act (window, "start-template", "(si)", "no such", 0);
  g_assert_cmpuint (hl_plant_n_components (plant_of (window)), ==, 0);
  end_window (window);
}

static void
test_a_template_takes_the_units_of_the_sheet (void)
{
  HlWindow *window = new_window ();
  g_action_group_change_action_state (G_ACTION_GROUP (window), "units", g_variant_new_string ("us"));
  act (window, "start-template", "(si)", "simple", 0);
  g_assert_cmpint (hl_plant_units (plant_of (window)), ==, HL_UNITS_US);
  hl_settings_set_string ("units", "metric");
  end_window (window);
}

static void
test_the_demo_hint_can_be_silenced (void)
{
  HlWindow *window = new_window ();
  hl_window_show_demo_hint (window);
  g_assert_null (find_button (GTK_WIDGET (window), "Do not say this again"));      /* nothing to say about an empty sheet */
  act (window, "start-template", "(si)", "simple", 0);
  hl_window_show_demo_hint (window);
  spin (30);
  g_signal_emit_by_name (find_button (GTK_WIDGET (window), "Do not say this again"), "clicked");
  g_assert_false (offers (window, "Do not say this again"));
  hl_window_show_demo_hint (window);
  g_assert_null (find_button (GTK_WIDGET (window), "Do not say this again"));
  hl_settings_set_bool ("demo-hint", TRUE);
  end_window (window);
}

static gboolean
is_entry (GtkWidget *widget)
{
  return GTK_IS_ENTRY (widget) && gtk_widget_get_mapped (widget) && gtk_widget_get_ancestor (widget, GTK_TYPE_POPOVER) != NULL;
}

static GtkWidget *
find_entry (GtkWidget *root)
{
  if (is_entry (root))
    return root;
  for (GtkWidget *child = gtk_widget_get_first_child (root); child != NULL; child = gtk_widget_get_next_sibling (child))
    {
      GtkWidget *found = find_entry (child);
      if (found != NULL)
        return found;
    }
  return NULL;
}

/* Types into the box of names and takes what stands first. */
static void
add_by_name (HlWindow *window, const char *typed)
{
  GtkWidget *entry;
  act (window, "quick-add", NULL);
  spin (50);
  entry = find_entry (GTK_WIDGET (canvas_of (window)));
  g_assert_nonnull (entry);
  gtk_editable_set_text (GTK_EDITABLE (entry), typed);
  spin (20);
  g_signal_emit_by_name (entry, "activate");
  spin (50);
}

static void
test_a_component_comes_by_its_name (void)
{
  HlWindow *window = new_window ();
  add_by_name (window, "turb");
  g_assert_nonnull (hl_plant_find_component (plant_of (window), "T1"));
  g_assert_true (hl_session_is_selected (hl_window_session (window), "T1"));
  add_by_name (window, "COND");                    /* the condenser before the air-cooled one */
  g_assert_nonnull (hl_plant_find_component (plant_of (window), "C1"));
  add_by_name (window, "no such thing");
  g_assert_cmpuint (hl_plant_n_components (plant_of (window)), ==, 2);
  end_window (window);
}

int
main (int argc, char **argv)
{
  if (!windows_init (&argc, &argv))
    return 0;
  g_test_add_func ("/app/start/templates", test_an_empty_sheet_offers_templates);
  g_test_add_func ("/app/start/units", test_a_template_takes_the_units_of_the_sheet);
  g_test_add_func ("/app/start/hint", test_the_demo_hint_can_be_silenced);
  g_test_add_func ("/app/start/by-name", test_a_component_comes_by_its_name);
  return windows_run ();
}
