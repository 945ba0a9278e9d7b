/* The dialogs: what is handed over is written, what cannot be is said, a question is answered once.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "app/hl-about.h"
#include "app/hl-confirm.h"
#include "app/hl-export-dialog.h"
#include "panes.h"
#include <glib/gstdio.h>

/* The dialog over @parent that was presented last. */
static GtkWidget *
dialog_over (GtkWidget *parent)
{
  GListModel *windows = gtk_window_get_toplevels ();

  settle_down ();
  for (guint n = 0; n < g_list_model_get_n_items (windows); n++)
    {
      g_autoptr (GtkWindow) window = g_list_model_get_item (windows, n);
      if (gtk_window_get_transient_for (window) == GTK_WINDOW (parent))
        return GTK_WIDGET (window);     /* GTK keeps toplevels */
    }
  return NULL;
}

static void
choose (GtkWidget *dialog, guint which, guint choice)
{
  GtkWidget *found[8] = { NULL };
  guint n = 0;
  GtkWidget *grid = find_type (dialog, GTK_TYPE_GRID);

  for (GtkWidget *child = gtk_widget_get_first_child (grid); child != NULL && n < G_N_ELEMENTS (found); child = gtk_widget_get_next_sibling (child))
    if (GTK_IS_DROP_DOWN (child))
      found[n++] = child;
  g_assert_cmpuint (which, <, n);
  gtk_drop_down_set_selected (GTK_DROP_DOWN (found[which]), choice);
  settle_down ();
}

static void
assert_begins (const char *path, const char *start)
{
  g_autofree char *text = NULL;
  g_autoptr (GError) error = NULL;
  gsize length;

  g_file_get_contents (path, &text, &length, &error);
  g_assert_no_error (error);
  g_assert_cmpuint (length, >, 200);
  g_assert_cmpmem (text, strlen (start), start, strlen (start));
  g_assert_cmpint (g_unlink (path), ==, 0);
}

static void
test_hand_over_writes_every_format (void)
{
  HlSession *session = loop_session ();
  GtkWidget *window = window_with (gtk_label_new ("parent"));
  g_autoptr (GError) error = NULL;
  g_autofree char *folder = g_dir_make_tmp ("heatloom-XXXXXX", &error);
  g_autofree char *svg = g_build_filename (folder, "a.svg", NULL), *pdf = g_build_filename (folder, "a.pdf", NULL);
  g_autofree char *bare = g_build_filename (folder, "b", NULL), *png = g_build_filename (folder, "b.png", NULL);
  g_autofree char *csv = g_build_filename (folder, "a.csv", NULL);

  hl_export_dialog_present (GTK_WINDOW (window), session);
  GtkWidget *dialog = dialog_over (window);
  g_assert_true (HL_IS_EXPORT_DIALOG (dialog));
  g_assert_nonnull (gtk_picture_get_paintable (GTK_PICTURE (find_type (dialog, GTK_TYPE_PICTURE))));
  g_assert_true (hl_export_dialog_write (HL_EXPORT_DIALOG (dialog), svg));
  assert_begins (svg, "<?xml");
  choose (dialog, 0, HL_HAND_OVER_STATE_DIAGRAM);
  g_assert_true (hl_export_dialog_write (HL_EXPORT_DIALOG (dialog), pdf));
  assert_begins (pdf, "%PDF");
  choose (dialog, 1, 2);                                        /* PNG: adds its own ending */
  choose (dialog, 2, 2);                                        /* dark */
  g_assert_true (hl_export_dialog_write (HL_EXPORT_DIALOG (dialog), bare));
  assert_begins (png, "\x89PNG");
  choose (dialog, 0, HL_HAND_OVER_LEDGER);
  g_assert_true (hl_export_dialog_write (HL_EXPORT_DIALOG (dialog), csv));
  g_autofree char *text = NULL;
  g_assert_true (g_file_get_contents (csv, &text, NULL, NULL));
  g_assert_nonnull (strstr (text, "bar"));
  g_assert_cmpint (g_unlink (csv), ==, 0);
  g_assert_cmpint (g_rmdir (folder), ==, 0);
  gtk_window_destroy (GTK_WINDOW (dialog));
  close_window (window, session);
}

static void
test_hand_over_writes_documents (void)
{
  static const struct { HlHandOver what; const char *ending, *begin; } documents[] = {
    { HL_HAND_OVER_SHEET, "svg", "<?xml" }, { HL_HAND_OVER_REPORT, "pdf", "%PDF" }, { HL_HAND_OVER_WORKBOOK, "xlsx", "PK" },
  };
  HlSession *session = loop_session ();
  GtkWidget *window = window_with (gtk_label_new ("parent"));
  g_autoptr (GError) error = NULL;
  g_autofree char *folder = g_dir_make_tmp ("heatloom-XXXXXX", &error);

  hl_export_dialog_present (GTK_WINDOW (window), session);
  GtkWidget *dialog = dialog_over (window);
  for (guint i = 0; i < G_N_ELEMENTS (documents); i++)
    {
      g_autofree char *bare = g_strdup_printf ("%s/%u", folder, i), *full = g_strdup_printf ("%s.%s", bare, documents[i].ending);
      choose (dialog, 0, documents[i].what);
      g_assert_true (hl_export_dialog_write (HL_EXPORT_DIALOG (dialog), bare));      /* adds its own ending */
      assert_begins (full, documents[i].begin);
    }
  g_assert_false (hl_export_dialog_write (HL_EXPORT_DIALOG (dialog), "/tmp/heatloom-tables.pdf"));
  g_assert_true (shows_text (dialog, ".xlsx"));
  g_assert_false (g_file_test ("/tmp/heatloom-tables.pdf", G_FILE_TEST_EXISTS));
  g_assert_cmpint (g_rmdir (folder), ==, 0);
  gtk_window_destroy (GTK_WINDOW (dialog));
  close_window (window, session);
}

static void
test_hand_over_says_what_it_cannot_write (void)
{
  HlSession *session = loop_session ();
  GtkWidget *window = window_with (gtk_label_new ("parent"));

  hl_export_dialog_present (GTK_WINDOW (window), session);
  GtkWidget *dialog = dialog_over (window);
  g_assert_false (hl_export_dialog_write (HL_EXPORT_DIALOG (dialog), "/tmp/heatloom-drawing.docx"));
  g_assert_true (shows_text (dialog, "docx"));
  g_assert_false (g_file_test ("/tmp/heatloom-drawing.docx", G_FILE_TEST_EXISTS));
  g_assert_false (hl_export_dialog_write (HL_EXPORT_DIALOG (dialog), "/nowhere/at/all.svg"));
  g_assert_true (shows_text (dialog, "nowhere"));
  gtk_window_destroy (GTK_WINDOW (dialog));
  close_window (window, session);
}

static void
test_hand_over_of_an_unsolved_plant (void)
{
  HlSession *session = hl_session_new ();
  GtkWidget *window = window_with (gtk_label_new ("parent"));

  hl_session_reset (session, hl_plant_new (), NULL);
  hl_export_dialog_present (GTK_WINDOW (window), session);
  GtkWidget *dialog = dialog_over (window);
  for (guint what = 0; what <= HL_HAND_OVER_WORKBOOK; what++)
    choose (dialog, 0, what);                                   /* must not fall over an empty sheet */
  gtk_window_destroy (GTK_WINDOW (dialog));
  close_window (window, session);
}

typedef struct { int n, button; } Answer;

static void
answered (int button, gpointer data)
{
  Answer *answer = data;
  answer->n++;
  answer->button = button;
}

static void
test_question_is_answered_once (void)
{
  static const char *const buttons[] = { "Cancel", "Discard", "Save", NULL };
  GtkWidget *window = window_with (gtk_label_new ("parent"));
  Answer answer = { 0, -9 };

  hl_confirm (GTK_WINDOW (window), "Save?", "There are changes.", buttons, answered, &answer);
  GtkWidget *dialog = dialog_over (window);
  g_assert_true (shows_text (dialog, "There are changes."));
  g_signal_emit_by_name (find_button (dialog, "Discard"), "clicked");
  settle_down ();
  g_assert_cmpint (answer.n, ==, 1);
  g_assert_cmpint (answer.button, ==, 1);

  hl_confirm (GTK_WINDOW (window), "Save?", "There are changes.", buttons, answered, &answer);
  dialog = dialog_over (window);
  g_assert_true (gtk_widget_has_css_class (gtk_window_get_default_widget (GTK_WINDOW (dialog)), "suggested-action"));
  gtk_window_close (GTK_WINDOW (dialog));
  settle_down ();
  g_assert_cmpint (answer.n, ==, 2);
  g_assert_cmpint (answer.button, ==, -1);
  gtk_window_destroy (GTK_WINDOW (window));
  settle_down ();
}

static void
test_about_states_licence_and_caution (void)
{
  GtkWidget *window = window_with (gtk_label_new ("parent"));

  hl_about_present (GTK_WINDOW (window));
  GtkWidget *dialog = dialog_over (window);
  g_assert_true (shows_text (dialog, HL_VERSION));
  g_assert_true (shows_text (dialog, "GPL-3.0-or-later"));
  g_assert_true (shows_text (dialog, "licensed practice"));
  gtk_window_destroy (GTK_WINDOW (dialog));
  gtk_window_destroy (GTK_WINDOW (window));
  settle_down ();
}

int
main (int argc, char **argv)
{
  if (!test_init (&argc, &argv))
    return 0;
  g_test_add_func ("/app/dialogs/hand over writes every format", test_hand_over_writes_every_format);
  g_test_add_func ("/app/dialogs/hand over writes documents", test_hand_over_writes_documents);
  g_test_add_func ("/app/dialogs/hand over says what it cannot write", test_hand_over_says_what_it_cannot_write);
  g_test_add_func ("/app/dialogs/hand over of an unsolved plant", test_hand_over_of_an_unsolved_plant);
  g_test_add_func ("/app/dialogs/question is answered once", test_question_is_answered_once);
  g_test_add_func ("/app/dialogs/about states licence and caution", test_about_states_licence_and_caution);
  return g_test_run ();
}
