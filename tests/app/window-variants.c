/* Variants in the window: chooser, marks in the nameplate and on the canvas, the table, the ghost and comparing.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "windows.h"
#include <glib/gstdio.h>
#include "app/hl-diagram-view.h"
#include "app/hl-quantity-row.h"
#include "app/hl-variants-view.h"

static const char *
chooser_text (HlWindow *window)
{
  return gtk_label_get_text (GTK_LABEL (gtk_widget_get_template_child (GTK_WIDGET (window), HL_TYPE_WINDOW, "variant_label")));
}

static HlWindow *
demo_window (void)
{
  HlWindow *window = new_window ();
  act (window, "open-demo", "s", "tallow-fen.heatloom");
  spin (50);
  return window;
}

static HlQuantityRow *
row_of (GtkWidget *root, const char *address)
{
  for (GtkWidget *child = gtk_widget_get_first_child (root); child != NULL; child = gtk_widget_get_next_sibling (child))
    {
      HlQuantityRow *found = NULL;
      if (HL_IS_QUANTITY_ROW (child))
        {
          g_autofree char *text = hl_address_to_text (hl_quantity_row_address (HL_QUANTITY_ROW (child)));
          found = g_str_equal (text, address) ? HL_QUANTITY_ROW (child) : NULL;
        }
      else
        found = row_of (child, address);
      if (found != NULL)
        return found;
    }
  return NULL;
}

static void
test_the_chooser_makes_names_and_ends_variants (void)
{
  HlWindow *window = demo_window ();
  HlSession *session = hl_window_session (window);
  g_autofree char *before = hl_document_to_json (hl_session_document (session)), *after = NULL;
  g_assert_cmpstr (chooser_text (window), ==, "Base");
  g_assert_false (is_enabled (window, "variant-delete"));
  act (window, "variant", "s", "river cooling");
  g_assert_cmpstr (chooser_text (window), ==, "river cooling");
  act (window, "variant-previous", NULL);
  g_assert_cmpstr (chooser_text (window), ==, "Base");
  act (window, "variant-new-named", "s", "summer");
  g_assert_cmpstr (chooser_text (window), ==, "summer");
  act (window, "variant-new-named", "s", "summer");            /* said, not done */
  g_assert_cmpuint (hl_document_n_variants (hl_session_document (session)), ==, 2);
  act (window, "variant-rename-to", "s", "hot summer");
  act (window, "variant-earlier", NULL);
  g_assert_cmpstr (hl_document_variant_name (hl_session_document (session), 0), ==, "hot summer");
  g_assert_false (is_enabled (window, "variant-earlier"));
  act (window, "variant", "s", "river cooling");
  act (window, "variant-promote", NULL);
  g_assert_cmpstr (chooser_text (window), ==, "Base");
  g_assert_cmpint (hl_document_find_variant (hl_session_document (session), "former base"), ==, 1);
  act (window, "variant", "s", "hot summer");
  act (window, "variant-delete", NULL);
  g_assert_cmpuint (hl_document_n_variants (hl_session_document (session)), ==, 1);
  while (is_enabled (window, "undo"))
    act (window, "undo", NULL);
  after = hl_document_to_json (hl_session_document (session));
  g_assert_cmpstr (after, ==, before);
  end_window (window);
}

static void
test_what_differs_is_marked_and_goes_back (void)
{
  HlWindow *window = demo_window ();
  HlSession *session = hl_window_session (window);
  HlQuantityRow *row;
  act (window, "variant", "s", "river cooling");
  act (window, "select", "s", "C1");
  spin (50);
  row = row_of (GTK_WIDGET (window), "C1.cooling_rise");
  g_assert_true (gtk_widget_has_css_class (GTK_WIDGET (row), "differs"));
  g_assert_false (gtk_widget_has_css_class (GTK_WIDGET (row_of (GTK_WIDGET (window), "C1.subcooling")), "differs"));
  g_assert_true (gtk_widget_activate_action (GTK_WIDGET (row), "row.as-reference", NULL));
  spin (50);
  row = row_of (GTK_WIDGET (window), "C1.cooling_rise");
  g_assert_false (gtk_widget_has_css_class (GTK_WIDGET (row), "differs"));
  for (guint i = 0; i < hl_document_changes (hl_session_document (session), 0)->len; i++)
    g_assert_cmpstr (hl_change_where (hl_document_changes (hl_session_document (session), 0)->pdata[i]), !=, "C1.cooling_rise");
  act (window, "variant", "s", "");
  spin (50);
  g_assert_false (gtk_widget_has_css_class (GTK_WIDGET (row_of (GTK_WIDGET (window), "C1.terminal_difference")), "differs"));
  end_window (window);
}

static void
test_the_table_follows_edits_and_reference (void)
{
  HlWindow *window = demo_window ();
  HlComparison *comparison;
  HlVariantsView *view;
  g_autoptr (HlTable) table = NULL;
  g_autofree char *text = NULL;
  act (window, "show-variants", NULL);
  spin (80);
  view = HL_VARIANTS_VIEW (find_widget (GTK_WIDGET (window), HL_TYPE_VARIANTS_VIEW));
  comparison = hl_variants_view_comparison (view);
  g_assert_cmpuint (hl_comparison_n_columns (comparison), ==, 2);
  act (window, "variant-new-named", "s", "hotter");
  act (window, "set-value", "(ss)", "B1.steam.T", "500 °C");
  comparison = hl_variants_view_comparison (view);
  g_assert_cmpuint (hl_comparison_n_columns (comparison), ==, 3);
  hl_variants_view_set_reference (view, 0);
  hl_variants_view_set_at_duty (view, TRUE);
  comparison = hl_variants_view_comparison (view);
  g_assert_cmpuint (hl_comparison_reference (comparison), ==, 1);
  table = hl_table_variants (comparison);
  text = hl_table_tabbed (table);
  g_assert_nonnull (strstr (text, "hotter – river cooling"));
  g_assert_nonnull (strstr (text, "\nDuty\tmass flow at steam outlet of B1\t"));
  act (window, "variant-delete", NULL);
  act (window, "variant", "s", "river cooling");
  act (window, "variant-delete", NULL);
  g_assert_null (hl_variants_view_comparison (view));
  end_window (window);
}

static void
test_a_ghost_is_another_variant (void)
{
  HlWindow *window = demo_window ();
  HlDiagramView *view = HL_DIAGRAM_VIEW (find_widget (GTK_WIDGET (window), HL_TYPE_DIAGRAM_VIEW));
  hl_diagram_view_set_ghost (view, "river cooling");
  gtk_test_widget_wait_for_draw (GTK_WIDGET (window));
  act (window, "variant", "s", "river cooling");     /* its own ghost is none */
  gtk_test_widget_wait_for_draw (GTK_WIDGET (window));
  hl_diagram_view_set_ghost (view, "");
  gtk_test_widget_wait_for_draw (GTK_WIDGET (window));
  act (window, "set-value", "(ss)", "B1.steam.T", "470 °C");
  act (window, "variant-delete", NULL);
  gtk_test_widget_wait_for_draw (GTK_WIDGET (window));
  hl_diagram_view_set_ghost (view, NULL);
  end_window (window);
}

/* With another file: what is added, changed and gone is counted in the legend, and the canvas draws all of it. */
static void
test_comparing_with_a_file (void)
{
  HlWindow *window = demo_window ();
  HlSession *session = hl_window_session (window);
  g_autofree char *path = g_build_filename (g_get_tmp_dir (), "heatloom-compare.heatloom", NULL);
  const char *const gone[] = { "V1", NULL };
  g_autoptr (HlPlant) other = hl_plant_without (hl_session_plant (session), gone);
  GError *error = NULL;
  g_assert_true (hl_plant_save (other, path, &error));
  act (window, "select", "s", "W1");
  act (window, "delete", NULL);
  act (window, "set-value", "(ss)", "U1.steam.m", "3 kg/s");
  act (window, "compare-path", "s", path);
  gtk_test_widget_wait_for_draw (GTK_WIDGET (window));
  g_assert_true (hl_session_is_comparing (session));
  g_assert_true (is_enabled (window, "compare-end"));
  act (window, "compare-variant", "s", "river cooling");
  gtk_test_widget_wait_for_draw (GTK_WIDGET (window));
  act (window, "compare-end", NULL);
  g_assert_false (hl_session_is_comparing (session));
  end_window (window);
  g_unlink (path);
}

int
main (int argc, char **argv)
{
  if (!windows_init (&argc, &argv))
    return 0;
  g_test_add_func ("/window-variants/chooser", test_the_chooser_makes_names_and_ends_variants);
  g_test_add_func ("/window-variants/marks", test_what_differs_is_marked_and_goes_back);
  g_test_add_func ("/window-variants/table", test_the_table_follows_edits_and_reference);
  g_test_add_func ("/window-variants/ghost", test_a_ghost_is_another_variant);
  g_test_add_func ("/window-variants/comparing", test_comparing_with_a_file);
  return windows_run ();
}
