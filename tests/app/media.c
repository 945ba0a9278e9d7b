/* Choosing a medium: the row in the nameplate, the table that compares all media, one step to undo.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "app/hl-media-dialog.h"
#include "app/hl-medium-row.h"
#include "app/hl-nameplate.h"
#include "panes.h"

static HlSession *
kestrel_session (void)
{
  HlSession *session = hl_session_new ();
  g_autofree char *path = g_build_filename (g_getenv ("HEATLOOM_DATADIR"), "examples", "kestrel-hollow.heatloom", NULL);
  g_autoptr (GError) error = NULL;
  hl_session_open (session, path, &error);
  g_assert_no_error (error);
  return session;
}

static const char *
medium_of (HlSession *session, const char *stream)
{
  return hl_plant_find_stream (hl_session_plant (session), stream)->medium;
}

static void
test_a_circuit_changes_in_one_step (void)
{
  HlSession *session = kestrel_session ();
  g_autoptr (GError) error = NULL;

  g_assert_true (hl_medium_apply (session, "5", "cyclopentane", &error));
  g_assert_no_error (error);
  g_assert_cmpstr (medium_of (session, "1"), ==, "cyclopentane");
  g_assert_cmpstr (medium_of (session, "7"), ==, "water");
  g_assert_cmpstr (hl_session_undo_name (session), ==, "Change Medium of Circuit 1");
  g_assert_true (hl_solution_is_solved (hl_session_solution (session)));
  hl_session_undo (session);
  g_assert_cmpstr (medium_of (session, "3"), ==, "isopentane");
  g_assert_false (hl_session_can_undo (session));
  /* The same medium again is no step; one that nobody knows is refused. */
  g_assert_true (hl_medium_apply (session, "5", "isopentane", &error));
  g_assert_false (hl_session_can_undo (session));
  g_assert_false (hl_medium_apply (session, "5", "whisky", &error));
  g_assert_error (error, HL_PLANT_ERROR, HL_PLANT_ERROR_CONTENT);
  g_object_unref (session);
}

static void
press (GtkWidget *button)
{
  g_assert_true (gtk_widget_get_sensitive (button));
  g_signal_emit_by_name (button, "clicked");
  settle_down ();
}

static void
test_table_offers_and_applies (void)
{
  HlSession *session = kestrel_session ();
  GtkWidget *dialog = hl_media_dialog_present (NULL, session, "2");
  GtkWidget *view = find_type (dialog, GTK_TYPE_COLUMN_VIEW), *search = find_type (dialog, GTK_TYPE_SEARCH_ENTRY);
  GtkSingleSelection *selection = GTK_SINGLE_SELECTION (gtk_column_view_get_model (GTK_COLUMN_VIEW (view)));

  settle_down ();
  g_assert_cmpuint (g_list_model_get_n_items (G_LIST_MODEL (selection)), >, 36);
  /* The medium in use is marked, and cannot be chosen again. */
  g_assert_nonnull (find_button (dialog, "Use Isopentane"));
  g_assert_false (gtk_widget_get_sensitive (find_button (dialog, "Use Isopentane")));
  gtk_editable_set_text (GTK_EDITABLE (search), "cyclopentane");
  g_signal_emit_by_name (search, "search-changed");
  settle_down ();
  g_assert_cmpuint (g_list_model_get_n_items (G_LIST_MODEL (selection)), ==, 1);
  gtk_single_selection_set_selected (selection, 0);
  press (find_button (dialog, "Use Cyclopentane"));
  g_assert_cmpstr (medium_of (session, "4"), ==, "cyclopentane");
  g_assert_finalize_object (session);      /* the dialog is gone */
}

static void
test_rows_in_the_nameplate (void)
{
  HlSession *session = kestrel_session ();
  GtkWidget *nameplate = hl_nameplate_new (session), *window = window_with (nameplate);

  hl_session_select (session, "EV1", FALSE);
  settle_down ();
  g_assert_true (shows_text (nameplate, "Isopentane"));
  g_assert_true (shows_text (nameplate, "Water and steam"));
  g_assert_true (shows_text (nameplate, "Medium at stream 7"));
  hl_session_select (session, "TX1", FALSE);
  settle_down ();
  g_assert_true (shows_text (nameplate, "Isopentane"));
  g_assert_false (shows_text (nameplate, "Water and steam"));
  hl_session_select (session, NULL, FALSE);
  settle_down ();
  g_assert_true (shows_text (nameplate, "Water by"));
  close_window (window, session);
}

int
main (int argc, char **argv)
{
  if (!test_init (&argc, &argv))
    return 0;
  g_test_add_func ("/app/media/one-step", test_a_circuit_changes_in_one_step);
  g_test_add_func ("/app/media/table", test_table_offers_and_applies);
  g_test_add_func ("/app/media/rows", test_rows_in_the_nameplate);
  return g_test_run ();
}
