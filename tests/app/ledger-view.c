/* The ledger view: rows, order, selection both ways, text for the clipboard.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "app/hl-ledger-line.h"
#include "app/hl-ledger-view.h"
#include "panes.h"

typedef struct { HlSession *session; GtkWidget *window, *ledger, *table; } Fixture;

static void
set_up (Fixture *f, gconstpointer data)
{
  f->session = loop_session ();
  f->ledger = hl_ledger_view_new (f->session);
  f->window = window_with (f->ledger);
  f->table = find_type (f->ledger, GTK_TYPE_COLUMN_VIEW);
}

static void
tear_down (Fixture *f, gconstpointer data)
{
  close_window (f->window, f->session);
}

static GtkSelectionModel *
model_of (Fixture *f)
{
  return gtk_column_view_get_model (GTK_COLUMN_VIEW (f->table));
}

static const char *
id_at (Fixture *f, guint row)
{
  g_autoptr (HlLedgerLine) line = g_list_model_get_item (G_LIST_MODEL (model_of (f)), row);
  return hl_ledger_line_id (line);      /* interned */
}

static GtkColumnViewColumn *
column_titled (Fixture *f, const char *start)
{
  GListModel *columns = gtk_column_view_get_columns (GTK_COLUMN_VIEW (f->table));

  for (guint n = 0; n < g_list_model_get_n_items (columns); n++)
    {
      g_autoptr (GtkColumnViewColumn) column = g_list_model_get_item (columns, n);
      if (g_str_has_prefix (gtk_column_view_column_get_title (column), start))
        return column;                  /* the view keeps it */
    }
  g_assert_not_reached ();
}

static void
test_every_stream_is_a_row (Fixture *f, gconstpointer data)
{
  g_assert_cmpuint (g_list_model_get_n_items (G_LIST_MODEL (model_of (f))), ==, 4);
  g_assert_true (shows_text (f->table, "65.00"));
}

/* The pressure falls at the turbine and rises at the pump: 2 and 3 are the low ones. */
static void
test_sorts_numbers_by_size (Fixture *f, gconstpointer data)
{
  GtkColumnViewColumn *column = column_titled (f, "Enthalpy");

  gtk_column_view_sort_by_column (GTK_COLUMN_VIEW (f->table), column, GTK_SORT_ASCENDING);
  settle_down ();
  g_assert_cmpstr (id_at (f, 0), ==, "3");       /* condensate */
  g_assert_cmpstr (id_at (f, 3), ==, "1");       /* live steam */
  gtk_column_view_sort_by_column (GTK_COLUMN_VIEW (f->table), column, GTK_SORT_DESCENDING);
  settle_down ();
  g_assert_cmpstr (id_at (f, 0), ==, "1");
}

static void
test_selection_is_one_in_both_places (Fixture *f, gconstpointer data)
{
  guint n;

  hl_session_select (f->session, "2", FALSE);
  settle_down ();
  g_assert_true (gtk_selection_model_is_selected (model_of (f), 1));
  g_assert_false (gtk_selection_model_is_selected (model_of (f), 0));
  gtk_selection_model_select_item (model_of (f), 3, TRUE);
  settle_down ();
  const char *const *ids = hl_session_selection (f->session, &n);
  g_assert_cmpuint (n, ==, 1);
  g_assert_cmpstr (ids[0], ==, "4");
}

static void
test_text_has_headings_and_the_selected_rows (Fixture *f, gconstpointer data)
{
  g_autofree char *all = hl_ledger_view_text (HL_LEDGER_VIEW (f->ledger)), *one = NULL;
  g_auto (GStrv) lines = g_strsplit (all, "\n", -1);

  g_assert_cmpuint (g_strv_length (lines), ==, 6);               /* headings, four streams, the end */
  g_assert_nonnull (strchr (lines[0], '\t'));
  hl_session_select (f->session, "3", FALSE);
  settle_down ();
  one = hl_ledger_view_text (HL_LEDGER_VIEW (f->ledger));
  g_auto (GStrv) few = g_strsplit (one, "\n", -1);
  g_assert_cmpuint (g_strv_length (few), ==, 3);
  g_assert_cmpstr (few[0], ==, lines[0]);
  g_assert_true (g_str_has_prefix (few[1], "3\t"));
}

static void
test_cells_follow_edits_and_units (Fixture *f, gconstpointer data)
{
  HlAddress address = hl_address_component ("T1", g_intern_static_string ("inlet.p"));
  g_autoptr (GError) error = NULL;

  g_assert_true (hl_session_set_text (f->session, &address, "70 bar", &error));
  g_assert_true (shows_text (f->table, "70.00"));
  hl_session_apply (f->session, "units", hl_plant_with_units (hl_session_plant (f->session), HL_UNITS_US), NULL, FALSE);
  settle_down ();
  g_assert_nonnull (strstr (gtk_column_view_column_get_title (column_titled (f, "Pressure")), "psi"));
}

static void
test_rows_follow_the_streams (Fixture *f, gconstpointer data)
{
  const char *ids[] = { "C1", NULL };

  hl_session_apply (f->session, "delete", hl_plant_without (hl_session_plant (f->session), ids), NULL, TRUE);
  settle_down ();
  g_assert_cmpuint (g_list_model_get_n_items (G_LIST_MODEL (model_of (f))), ==, 2);
  hl_session_undo (f->session);
  settle_down ();
  g_assert_cmpuint (g_list_model_get_n_items (G_LIST_MODEL (model_of (f))), ==, 4);
}

static void
test_columns_are_chosen_and_remembered (Fixture *f, gconstpointer data)
{
  g_assert_true (gtk_column_view_column_get_visible (column_titled (f, "Enthalpy")));
  g_assert_nonnull (gtk_column_view_column_get_header_menu (column_titled (f, "Enthalpy")));
  g_assert_true (gtk_widget_activate_action (f->table, "ledger.show-h", NULL));
  g_assert_false (gtk_column_view_column_get_visible (column_titled (f, "Enthalpy")));
  g_autofree char *text = hl_ledger_view_text (HL_LEDGER_VIEW (f->ledger));
  g_assert_null (strstr (text, "Enthalpy"));
  g_assert_nonnull (strstr (text, "Pressure"));

  /* Another ledger, as in the next run. */
  g_autoptr (GtkWidget) other = g_object_ref_sink (hl_ledger_view_new (f->session));
  g_autofree char *again = hl_ledger_view_text (HL_LEDGER_VIEW (other));
  g_assert_cmpstr (again, ==, text);
  g_assert_true (gtk_widget_activate_action (f->table, "ledger.show-h", NULL));
  g_assert_true (gtk_column_view_column_get_visible (column_titled (f, "Enthalpy")));
  g_autofree char *whole = hl_ledger_view_text (HL_LEDGER_VIEW (f->ledger));
  g_assert_nonnull (strstr (whole, "Enthalpy"));
}

int
main (int argc, char **argv)
{
  if (!test_init (&argc, &argv))
    return 0;
#define ADD(name, func) g_test_add ("/app/ledger-view/" name, Fixture, NULL, set_up, func, tear_down)
  ADD ("every stream is a row", test_every_stream_is_a_row);
  ADD ("sorts numbers by size", test_sorts_numbers_by_size);
  ADD ("selection is one in both places", test_selection_is_one_in_both_places);
  ADD ("text has headings and the selected rows", test_text_has_headings_and_the_selected_rows);
  ADD ("cells follow edits and units", test_cells_follow_edits_and_units);
  ADD ("rows follow the streams", test_rows_follow_the_streams);
  ADD ("columns are chosen and remembered", test_columns_are_chosen_and_remembered);
#undef ADD
  return g_test_run ();
}
