/* Variants side by side: what the rows say is what the solutions say, and marks of what differs.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "draw/marks.h"
#include "draw/variants.h"
#include <math.h>
#include <string.h>

static HlDocument *
tallow_fen (void)
{
  g_autofree char *path = g_test_build_filename (G_TEST_DIST, "..", "data", "examples", "tallow-fen.heatloom", NULL);
  GError *error = NULL;
  HlDocument *document = hl_document_load (path, &error);
  g_assert_no_error (error);
  return document;
}

/* Tallow Fen with a second variant: without the heater, its lines and its drain valve. */
static HlDocument *
with_heater_out (void)
{
  static const char *const gone[] = { "H1", "V2", "L1", "9", NULL };
  g_autoptr (HlDocument) document = tallow_fen (), two = NULL;
  g_autoptr (HlPlant) without = hl_plant_without (hl_document_plant (document, HL_DOCUMENT_BASE), gone), joined = NULL;
  two = hl_document_with_variant (document, "heater out", HL_DOCUMENT_BASE, NULL);
  joined = hl_plant_with_stream (without, hl_stream_new ("7", "P2", "outlet", "B1", "feed"));
  return hl_document_with_plant (two, 1, joined);
}

static const HlComparisonRow *
find_row (const HlComparison *comparison, const char *key)
{
  for (guint i = 0; i < hl_comparison_n_rows (comparison); i++)
    if (g_str_equal (hl_comparison_row (comparison, i)->key, key))
      return hl_comparison_row (comparison, i);
  return NULL;
}

static void
test_rows_say_what_the_solutions_say (void)
{
  g_autoptr (HlDocument) document = tallow_fen ();
  g_autoptr (HlComparison) comparison = hl_comparison_new (document, HL_DOCUMENT_BASE, FALSE, NULL);
  const HlComparisonRow *row = find_row (comparison, "gross_power"), *exhaust = find_row (comparison, "T1.exhaust.p");
  g_assert_cmpuint (hl_comparison_n_columns (comparison), ==, 2);
  g_assert_cmpstr (hl_comparison_name (comparison, 1), ==, "river cooling");
  for (guint i = 0; i < 2; i++)
    {
      HlAddress gross = hl_address_plant ("gross_power");
      double value;
      g_assert_true (hl_solution_value (hl_comparison_solution (comparison, i), &gross, &value));
      g_assert_cmpfloat (row->cells[i].value, ==, value);
    }
  g_assert_cmpstr (row->cells[0].difference, ==, "");
  g_assert_true (g_str_has_prefix (row->cells[1].difference, "+"));
  g_assert_false (exhaust->cells[0].is_own);
  g_assert_true (exhaust->cells[1].is_own);
  g_assert_cmpstr (exhaust->cells[0].text, ==, "0.07000 bar");
  g_assert_nonnull (strstr (exhaust->cells[1].text, "found"));
  g_assert_cmpuint (hl_comparison_n_notes (comparison), ==, 0);
}

/* The other way round every difference turns its sign. */
static void
test_the_reference_turns_the_differences (void)
{
  g_autoptr (HlDocument) document = tallow_fen ();
  g_autoptr (HlComparison) from_base = hl_comparison_new (document, HL_DOCUMENT_BASE, FALSE, NULL);
  g_autoptr (HlComparison) from_river = hl_comparison_new (document, 0, FALSE, from_base);
  g_assert_true (hl_comparison_solution (from_base, 1) == hl_comparison_solution (from_river, 1));     /* solved once */
  for (guint i = 0; i < hl_comparison_n_rows (from_base); i++)
    {
      const HlComparisonRow *row = hl_comparison_row (from_base, i), *turned = hl_comparison_row (from_river, i);
      const char *there = row->cells[1].difference, *back = turned->cells[0].difference;
      g_assert_cmpstr (row->key, ==, turned->key);
      g_assert_cmpint (*there == '\0', ==, *back == '\0');
      if (*there != '\0')
        g_assert_cmpint (g_str_has_prefix (there, "+"), !=, g_str_has_prefix (back, "+"));
    }
}

static void
test_what_comes_and_goes_is_a_row (void)
{
  g_autoptr (HlDocument) document = with_heater_out ();
  g_autoptr (HlComparison) comparison = hl_comparison_new (document, HL_DOCUMENT_BASE, FALSE, NULL);
  g_autoptr (HlTable) table = hl_table_variants (comparison);
  const HlComparisonRow *heater = find_row (comparison, "item:H1");
  g_autofree char *tabbed = hl_table_tabbed (table);
  g_assert_cmpstr (heater->cells[0].text, ==, "there");
  g_assert_cmpstr (heater->cells[1].text, ==, "there");
  g_assert_cmpstr (heater->cells[2].text, ==, "–");
  g_assert_true (heater->cells[2].is_own);
  g_assert_null (find_row (comparison, "item:10"));        /* its steam line says nothing new */
  g_assert_cmpuint (table->n_columns, ==, 3 + 3 + 2);
  g_assert_nonnull (strstr (tabbed, "\theater out – Base\n"));
}

/* Every cell of the table that is a number differs from its neighbour as the column of differences says. */
static void
test_differences_of_the_table_are_differences (void)
{
  g_autoptr (HlDocument) document = with_heater_out ();
  g_autoptr (HlComparison) comparison = hl_comparison_new (document, HL_DOCUMENT_BASE, FALSE, NULL);
  g_autoptr (HlTable) table = hl_table_variants (comparison);
  guint n = 0;
  for (guint row = 0; row < hl_comparison_n_rows (comparison); row++)
    for (guint i = 1; i < 3; i++)
      {
        double difference = hl_table_cell (table, row, 5 + i)->number;
        if (isnan (difference))
          continue;
        g_assert_cmpfloat_with_epsilon (difference, hl_table_cell (table, row, 3 + i)->number - hl_table_cell (table, row, 3)->number,
                                        1e-9 * fabs (hl_table_cell (table, row, 3)->number));
        n++;
      }
  g_assert_cmpuint (n, >, 10);       /* it has looked at something */
}

static void
test_marks_tell_added_changed_and_removed (void)
{
  g_autoptr (HlDocument) document = with_heater_out ();
  HlPlant *base = hl_document_plant (document, HL_DOCUMENT_BASE), *river = hl_document_plant (document, 0), *out = hl_document_plant (document, 1);
  g_autoptr (HlMarks) of_river = hl_marks_new (base, river), of_out = hl_marks_new (base, out), back = hl_marks_new (out, base), none = hl_marks_new (base, base);
  g_assert_cmpint (hl_marks_of (of_river, "C1"), ==, HL_MARK_CHANGED);
  g_assert_cmpint (hl_marks_of (of_river, "Y2"), ==, HL_MARK_NONE);           /* another name only */
  g_assert_cmpint (hl_marks_of (of_out, "7"), ==, HL_MARK_CHANGED);           /* ends elsewhere */
  g_assert_cmpuint (hl_marks_removed_components (of_out)->len, ==, 3);
  g_assert_cmpuint (hl_marks_count (of_out, HL_MARK_ADDED), ==, 0);
  g_assert_cmpint (hl_marks_of (back, "H1"), ==, HL_MARK_ADDED);
  g_assert_cmpuint (hl_marks_count (back, HL_MARK_ADDED), ==, hl_marks_count (of_out, HL_MARK_REMOVED));
  for (HlMark mark = HL_MARK_ADDED; mark < HL_N_MARKS; mark++)
    g_assert_cmpuint (hl_marks_count (none, mark), ==, 0);
}

/* Each sign has a form of its own, for who does not see the colours: drawn in one colour, no two are alike. */
static void
test_signs_differ_without_colour (void)
{
  HlTheme theme = *hl_theme (HL_THEME_PAPER);
  cairo_surface_t *surfaces[HL_N_MARKS];
  theme.good = theme.accent = theme.warning = theme.ink;
  for (int mark = 1; mark < HL_N_MARKS; mark++)
    {
      cairo_t *cr;
      surfaces[mark] = cairo_image_surface_create (CAIRO_FORMAT_ARGB32, 24, 24);
      cr = cairo_create (surfaces[mark]);
      hl_draw_mark (cr, &theme, (HlMark) mark, 12, 12, 9);
      cairo_destroy (cr);
      cairo_surface_flush (surfaces[mark]);
      for (int other = 1; other < mark; other++)
        g_assert_cmpint (memcmp (cairo_image_surface_get_data (surfaces[mark]), cairo_image_surface_get_data (surfaces[other]), 24 * 24 * 4), !=, 0);
    }
  for (int mark = 1; mark < HL_N_MARKS; mark++)
    cairo_surface_destroy (surfaces[mark]);
}

int
main (int argc, char **argv)
{
  g_test_init (&argc, &argv, NULL);
  g_test_add_func ("/variants/rows-say-what-the-solutions-say", test_rows_say_what_the_solutions_say);
  g_test_add_func ("/variants/the-reference-turns-the-differences", test_the_reference_turns_the_differences);
  g_test_add_func ("/variants/what-comes-and-goes-is-a-row", test_what_comes_and_goes_is_a_row);
  g_test_add_func ("/variants/differences-are-differences", test_differences_of_the_table_are_differences);
  g_test_add_func ("/variants/marks", test_marks_tell_added_changed_and_removed);
  g_test_add_func ("/variants/signs-differ-without-colour", test_signs_differ_without_colour);
  return g_test_run ();
}
