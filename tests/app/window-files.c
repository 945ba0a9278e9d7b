/* Files of a window: changed by others, removed, read-only, reverted, dragged in, opened lately.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "windows.h"
#include "app/hl-settings.h"
#include <glib/gstdio.h>
#include <string.h>

/* A window whose plant, one pump, is saved in a file of its own folder. */
static HlWindow *
saved_window (char **folder, char **path)
{
  HlWindow *window = new_window ();
  *folder = g_dir_make_tmp ("heatloom-files-XXXXXX", NULL);
  *path = g_build_filename (*folder, "pump.heatloom", NULL);
  act (window, "add-component-at", "(sii)", "pump", 0, 0);
  act (window, "save-to", "s", *path);
  g_assert_false (hl_session_is_dirty (hl_window_session (window)));
  return window;
}

static void
end_saved (HlWindow *window, char *folder, char *path)
{
  end_window (window);
  g_remove (path);
  g_assert_cmpint (g_rmdir (folder), ==, 0);     /* nothing else was left there */
  g_free (folder);
  g_free (path);
}

/* What another program would do: two components instead of one. */
static void
change_from_outside (const char *path)
{
  g_autoptr (GError) error = NULL;
  g_autoptr (HlPlant) plant = hl_plant_load (path, &error);
  g_autoptr (HlPlant) more = NULL;
  g_assert_no_error (error);
  more = hl_plant_with_component (plant, hl_component_new (hl_kind_lookup ("valve"), "V9", 20, 0));
  g_assert_true (hl_plant_save (more, path, &error));
  g_assert_no_error (error);
}

/* Waits for a button in the window itself, as the system's notice of a changed file takes its time. */
static GtkWidget *
wait_for_button (HlWindow *window, const char *label)
{
  GtkWidget *button = NULL;
  for (int n = 0; n < 250 && (button = find_button (GTK_WIDGET (window), label)) == NULL; n++)
    spin (20);
  g_assert_nonnull (button);
  return button;
}

static void
test_a_file_changed_by_others_can_be_read_again (void)
{
  char *folder, *path;
  HlWindow *window = saved_window (&folder, &path);
  change_from_outside (path);
  g_signal_emit_by_name (wait_for_button (window, "Read it again"), "clicked");
  g_assert_cmpuint (hl_plant_n_components (plant_of (window)), ==, 2);
  g_assert_false (hl_session_is_dirty (hl_window_session (window)));
  g_assert_null (find_button (GTK_WIDGET (window), "Read it again"));
  g_assert_cmpstr (hl_session_undo_name (hl_window_session (window)), ==, "Revert to the file");
  act (window, "undo", NULL);
  g_assert_cmpuint (hl_plant_n_components (plant_of (window)), ==, 1);
  g_assert_true (hl_session_is_dirty (hl_window_session (window)));
  end_saved (window, folder, path);
}

static void
test_what_others_wrote_is_not_overwritten_in_silence (void)
{
  char *folder, *path;
  HlWindow *window = saved_window (&folder, &path);
  g_autoptr (HlPlant) kept = NULL;
  g_autoptr (HlPlant) overwritten = NULL;
  change_from_outside (path);
  act (window, "add-component-at", "(sii)", "mixer", 9, 9);
  act (window, "save", NULL);
  answer (window, "Cancel");
  kept = hl_plant_load (path, NULL);
  g_assert_nonnull (hl_plant_find_component (kept, "V9"));
  g_assert_true (hl_session_is_dirty (hl_window_session (window)));
  act (window, "save", NULL);
  answer (window, "Overwrite");
  overwritten = hl_plant_load (path, NULL);
  g_assert_null (hl_plant_find_component (overwritten, "V9"));
  g_assert_nonnull (hl_plant_find_component (overwritten, "M1"));
  g_assert_null (find_button (GTK_WIDGET (window), "Keep mine"));
  act (window, "add-component-at", "(sii)", "mixer", 19, 9);
  act (window, "save", NULL);                       /* one's own saving is no change by others */
  g_assert_false (hl_session_is_dirty (hl_window_session (window)));
  spin (300);
  g_assert_null (find_button (GTK_WIDGET (window), "Keep mine"));
  end_saved (window, folder, path);
}

static void
test_a_removed_file_is_told (void)
{
  char *folder, *path;
  HlWindow *window = saved_window (&folder, &path);
  g_remove (path);
  wait_for_button (window, "Keep mine");
  g_signal_emit_by_name (wait_for_button (window, "Keep mine"), "clicked");
  g_assert_null (find_button (GTK_WIDGET (window), "Keep mine"));
  act (window, "save", NULL);
  g_assert_true (g_file_test (path, G_FILE_TEST_EXISTS));
  end_saved (window, folder, path);
}

static void
test_a_read_only_file_is_told_and_stays (void)
{
  char *folder, *path;
  HlWindow *window = saved_window (&folder, &path), *reader = new_window ();
  g_autofree char *before = NULL, *after = NULL;
  g_assert_true (g_file_get_contents (path, &before, NULL, NULL));
  g_chmod (path, 0444);
  act (reader, "open-path", "s", path);
  g_assert_nonnull (find_button (GTK_WIDGET (reader), "Save as …"));
  act (reader, "add-component-at", "(sii)", "mixer", 9, 9);
  act (reader, "save", NULL);                       /* asks for a place instead */
  spin (30);
  g_assert_true (hl_session_is_dirty (hl_window_session (reader)));
  g_assert_true (g_file_get_contents (path, &after, NULL, NULL));
  g_assert_cmpstr (after, ==, before);
  gtk_window_destroy (GTK_WINDOW (reader));
  spin (100);
  g_chmod (path, 0644);
  end_saved (window, folder, path);
}

static void
test_revert_needs_a_file_and_can_be_undone (void)
{
  char *folder, *path;
  HlWindow *window = saved_window (&folder, &path), *fresh = new_window ();
  g_autoptr (GError) error = NULL;
  g_assert_false (is_enabled (fresh, "revert"));
  g_assert_false (hl_session_revert (hl_window_session (fresh), &error));
  g_assert_error (error, HL_PLANT_ERROR, HL_PLANT_ERROR_FILE);
  end_window (fresh);
  g_assert_true (is_enabled (window, "revert"));
  act (window, "add-component-at", "(sii)", "mixer", 9, 9);
  act (window, "revert", NULL);
  g_assert_cmpuint (hl_plant_n_components (plant_of (window)), ==, 1);
  act (window, "undo", NULL);
  g_assert_cmpuint (hl_plant_n_components (plant_of (window)), ==, 2);
  g_remove (path);
  act (window, "revert", NULL);                     /* nothing to read: told, and nothing lost */
  answer (window, "Close");
  g_assert_cmpuint (hl_plant_n_components (plant_of (window)), ==, 2);
  end_saved (window, folder, path);
}

static GtkDropTarget *
drop_target_of (HlWindow *window)
{
  g_autoptr (GListModel) controllers = gtk_widget_observe_controllers (GTK_WIDGET (window));
  for (guint n = 0; n < g_list_model_get_n_items (controllers); n++)
    {
      g_autoptr (GtkEventController) controller = g_list_model_get_item (controllers, n);
      if (GTK_IS_DROP_TARGET (controller))
        return GTK_DROP_TARGET (controller);
    }
  g_error ("the window takes no drops");
}

static void
test_a_file_can_be_dragged_in (void)
{
  char *folder, *path;
  HlWindow *window = saved_window (&folder, &path), *other = new_window ();
  g_autoptr (GFile) file = g_file_new_for_path (path);
  GSList one = { file, NULL };
  GValue value = G_VALUE_INIT;
  gboolean is_taken = FALSE;
  g_value_init (&value, GDK_TYPE_FILE_LIST);
  g_value_set_boxed (&value, &one);
  g_signal_emit_by_name (drop_target_of (other), "drop", &value, 100.0, 100.0, &is_taken);
  g_value_unset (&value);
  g_assert_true (is_taken);
  g_assert_cmpstr (hl_session_path (hl_window_session (other)), ==, path);
  end_window (other);
  end_saved (window, folder, path);
}

static void
test_files_are_listed_once_they_were_opened (void)
{
  char *folder, *path;
  HlWindow *window = saved_window (&folder, &path);
  g_autofree char *uri = g_filename_to_uri (path, NULL, NULL);
  for (int n = 0; n < 100 && !gtk_recent_manager_has_item (gtk_recent_manager_get_default (), uri); n++)
    spin (20);
  g_assert_true (gtk_recent_manager_has_item (gtk_recent_manager_get_default (), uri));
  end_saved (window, folder, path);
}

static void
test_a_new_plant_has_the_units_chosen_last (void)
{
  HlWindow *window = new_window ();
  g_action_group_change_action_state (G_ACTION_GROUP (window), "units", g_variant_new_string ("us"));
  act (window, "add-component-at", "(sii)", "pump", 0, 0);
  act (window, "new", NULL);
  answer (window, "Discard");
  g_assert_cmpint (hl_plant_units (plant_of (window)), ==, HL_UNITS_US);
  hl_settings_set_string ("units", "metric");
  end_window (window);
}

int
main (int argc, char **argv)
{
  if (!windows_init (&argc, &argv))
    return 0;
  g_test_add_func ("/app/window-files/changed", test_a_file_changed_by_others_can_be_read_again);
  g_test_add_func ("/app/window-files/overwrite", test_what_others_wrote_is_not_overwritten_in_silence);
  g_test_add_func ("/app/window-files/removed", test_a_removed_file_is_told);
  g_test_add_func ("/app/window-files/read-only", test_a_read_only_file_is_told_and_stays);
  g_test_add_func ("/app/window-files/revert", test_revert_needs_a_file_and_can_be_undone);
  g_test_add_func ("/app/window-files/drop", test_a_file_can_be_dragged_in);
  g_test_add_func ("/app/window-files/recent", test_files_are_listed_once_they_were_opened);
  g_test_add_func ("/app/window-files/units", test_a_new_plant_has_the_units_chosen_last);
  return windows_run ();
}
