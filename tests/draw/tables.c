/* Tables to hand over: the summary adds up, and every form says the same.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "draw/tables.h"
#include "../engine/plants.h"
#include <math.h>
#include <string.h>

static const char *const demos[] = { "ferry-lane", "linden-row", "tallow-fen" };

static HlSolution *
solve_demo (guint n)
{
  g_autoptr (GError) error = NULL;
  g_autofree char *name = g_strconcat (demos[n], ".heatloom", NULL);
  g_autofree char *path = g_test_build_filename (G_TEST_DIST, "..", "data", "examples", name, NULL);
  g_autoptr (HlPlant) plant = hl_plant_load (path, &error);
  HlSolution *solution;
  g_assert_no_error (error);
  solution = hl_solve (plant, NULL);
  test_assert_solved (solution);
  return solution;
}

static double
value_of (const HlSummary *summary, const char *key)
{
  const HlSummaryLine *line = hl_summary_find (summary, key);
  return line != NULL ? line->value : NAN;
}

static double
sum_of_parts (const HlSummary *summary, const char *key)
{
  g_autofree char *prefix = g_strconcat (key, ":", NULL);
  double sum = 0.0;
  for (guint n = 0; n < hl_summary_n_lines (summary); n++)
    if (g_str_has_prefix (hl_summary_line (summary, n)->key, prefix))
      {
        g_assert_true (hl_summary_line (summary, n)->is_part);
        sum += hl_summary_line (summary, n)->value;
      }
  return sum;
}

/* From the definitions: what the lines are called must be what they are. */
static void
test_the_summary_adds_up (void)
{
  for (guint i = 0; i < G_N_ELEMENTS (demos); i++)
    {
      g_autoptr (HlSolution) solution = solve_demo (i);
      g_autoptr (HlSummary) summary = hl_summary_new (solution);
      double gross = value_of (summary, "gross_power"), own = value_of (summary, "own_consumption"), net = value_of (summary, "net_power");
      double heat = value_of (summary, "heat_input");
      test_assert_near (gross - own, net, 1e-9);
      test_assert_near (sum_of_parts (summary, "own_consumption"), own, 1e-9);
      test_assert_near (heat / gross, value_of (summary, "turbine_heat_rate_gross"), 1e-9);
      test_assert_near (heat / (gross - own), value_of (summary, "turbine_heat_rate_net"), 1e-9);
      test_assert_near (value_of (summary, "live_steam") / gross, value_of (summary, "steam_rate"), 1e-9);
      if (hl_summary_find (summary, "fuel_heat_lhv") == NULL)
        {
          test_assert_near (net / heat, value_of (summary, "net_efficiency_lhv"), 1e-9);
          g_assert_null (hl_summary_find (summary, "plant_heat_rate_net_lhv"));
          g_assert_null (hl_summary_find (summary, "fuel_heat_hhv"));
          continue;
        }
      test_assert_near (1.0 / value_of (summary, "plant_heat_rate_net_lhv"), value_of (summary, "net_efficiency_lhv"), 1e-9);
      test_assert_near (1.0 / value_of (summary, "plant_heat_rate_gross_hhv"), value_of (summary, "gross_efficiency_hhv"), 1e-9);
      test_assert_near (net / value_of (summary, "fuel_heat_hhv"), value_of (summary, "net_efficiency_hhv"), 1e-9);
      g_assert_cmpfloat (value_of (summary, "fuel_heat_hhv"), >, value_of (summary, "fuel_heat_lhv"));
    }
}

/* The boiler's own ratio of heating values, not one read back from the efficiency. */
static void
test_the_higher_heating_value_is_the_boilers (void)
{
  g_autoptr (HlSolution) solution = solve_demo (2);
  g_autoptr (HlSummary) summary = hl_summary_new (solution);
  test_assert_near (value_of (summary, "fuel_heat_hhv") / value_of (summary, "fuel_heat_lhv"), test_value (solution, "B1.fuel_hhv_ratio"), 1e-9);
  test_assert_near (value_of (summary, "make_up"), test_value (solution, "W1.outlet.m"), 1e-12);
  test_assert_near (value_of (summary, "heat_delivered"), test_value (solution, "U1.heat"), 1e-9);
}

static void
test_what_is_not_solved_has_no_performance (void)
{
  g_autoptr (HlPlant) loop = test_plant_let_go (test_plant (test_simple_loop), "plant.net_power");
  g_autoptr (HlSolution) open = hl_solve (loop, NULL);
  g_autoptr (HlSummary) none = hl_summary_new (open);
  g_autoptr (HlTable) table = hl_table_summary (open, HL_UNITS_METRIC);
  g_assert_false (hl_solution_is_solved (open));
  g_assert_cmpuint (hl_summary_n_lines (none), ==, 0);
  g_assert_cmpuint (table->n_rows, ==, 0);
}

/* Undoes the quotes of one CSV line. */
static GStrv
fields (const char *line)
{
  g_autoptr (GStrvBuilder) builder = g_strv_builder_new ();
  g_autoptr (GString) field = g_string_new (NULL);
  gboolean is_quoted = FALSE;
  for (const char *c = line;; c++)
    {
      if (*c == '"' && is_quoted && c[1] == '"')
        g_string_append_c (field, *++c);
      else if (*c == '"')
        is_quoted = !is_quoted;
      else if (*c == '\0' || (*c == ',' && !is_quoted))
        {
          g_strv_builder_add (builder, field->str);
          g_string_truncate (field, 0);
          if (*c == '\0')
            break;
        }
      else
        g_string_append_c (field, *c);
    }
  return g_strv_builder_end (builder);
}

static void
check_csv (const HlTable *table)
{
  g_autofree char *csv = hl_table_csv (table);
  g_auto (GStrv) lines = g_strsplit (csv, "\r\n", -1);
  g_assert_cmpuint (g_strv_length (lines), ==, table->n_rows + 2);
  for (guint row = 0; row < table->n_rows; row++)
    {
      g_auto (GStrv) read = fields (lines[row + 1]);
      g_assert_cmpuint (g_strv_length (read), ==, table->n_columns);
      for (guint column = 0; column < table->n_columns; column++)
        {
          const HlTableCell *cell = hl_table_cell (table, row, column);
          if (isfinite (cell->number))
            g_assert_cmpfloat (fabs (g_ascii_strtod (read[column], NULL) - cell->number), <=, 1e-9 * fabs (cell->number));
          else
            g_assert_cmpstr (read[column], ==, cell->text);
        }
    }
}

/* What is read is the number, rounded: never further off than half its last digit. */
static void
check_rounding (const HlTable *table)
{
  for (guint row = 0; row < table->n_rows; row++)
    for (guint column = 0; column < table->n_columns; column++)
      {
        const HlTableCell *cell = hl_table_cell (table, row, column);
        if (isfinite (cell->number) && strchr (cell->text, 'e') == NULL)
          g_assert_cmpfloat (fabs (g_ascii_strtod (cell->text, NULL) - cell->number), <=, MAX (0.5000001 * pow (10.0, -cell->decimals), 6e-4 * fabs (cell->number)));
      }
}

static void
test_every_table_of_every_plant_reads_back (void)
{
  for (guint i = 0; i < G_N_ELEMENTS (demos); i++)
    for (int units = 0; units < HL_N_UNIT_SETS; units++)
      {
        g_autoptr (HlSolution) solution = solve_demo (i);
        g_autoptr (HlTable) summary = hl_table_summary (solution, (HlUnitSet) units), streams = hl_table_streams (solution, (HlUnitSet) units);
        g_autoptr (HlTable) components = hl_table_components (solution, (HlUnitSet) units), findings = hl_table_findings (solution);
        g_autoptr (HlTable) values = hl_table_values (solution, (HlUnitSet) units, FALSE);
        const HlTable *const all[] = { summary, streams, components, findings, values };
        for (guint t = 0; t < G_N_ELEMENTS (all); t++)
          {
            g_autofree char *text = hl_table_text (all[t]);
            g_auto (GStrv) lines = g_strsplit (text, "\n", -1);
            g_assert_cmpuint (g_strv_length (lines), ==, all[t]->n_rows + 2);
            check_csv (all[t]);
            check_rounding (all[t]);
          }
        g_assert_cmpuint (components->n_rows, >, 20);
        g_assert_cmpuint (findings->n_rows, ==, hl_solution_n_findings (solution) + hl_solution_n_dismissed (solution));
      }
}

static void
test_assumed_values_have_their_sources (void)
{
  for (guint i = 0; i < G_N_ELEMENTS (demos); i++)
    {
      g_autoptr (HlSolution) solution = solve_demo (i);
      g_autoptr (HlTable) table = hl_table_values (solution, HL_UNITS_METRIC, TRUE);
      g_assert_cmpuint (table->n_rows, ==, hl_plant_n_assumed (hl_solution_plant (solution)));
      for (guint row = 0; row < table->n_rows; row++)
        g_assert_cmpstr (hl_table_cell (table, row, 4)->text, !=, "");
    }
}

static void
test_an_unusual_assumption_does_not_borrow_the_source (void)
{
  g_autoptr (HlPlant) usual = test_plant ("new pump P1"), other = test_plant ("new pump P1 ~isentropic_efficiency=0.6");
  g_autoptr (HlSolution) a = hl_solve (usual, NULL), b = hl_solve (other, NULL);
  g_autoptr (HlTable) first = hl_table_values (a, HL_UNITS_METRIC, TRUE), second = hl_table_values (b, HL_UNITS_METRIC, TRUE);
  guint n_seen = 0;
  for (guint row = 0; row < first->n_rows; row++)
    if (g_str_equal (hl_table_cell (first, row, 5)->text, "P1.isentropic_efficiency"))
      {
        g_assert_true (g_str_has_prefix (hl_table_cell (first, row, 4)->text, "common practice"));
        g_assert_true (g_str_has_prefix (hl_table_cell (second, row, 4)->text, "assumed for this plant; usual is 0.750"));
        n_seen++;
      }
  g_assert_cmpuint (n_seen, ==, 1);
}

static void
test_small_powers_keep_their_digits (void)
{
  g_autoptr (HlSolution) solution = solve_demo (0);
  g_autoptr (HlTable) table = hl_table_summary (solution, HL_UNITS_METRIC);
  for (guint row = 0; row < table->n_rows; row++)
    if (g_str_equal (hl_table_cell (table, row, 5)->text, "own_consumption"))
      {
        g_assert_cmpstr (hl_table_cell (table, row, 3)->text, ==, "kW");
        g_assert_cmpfloat_with_epsilon (hl_table_cell (table, row, 2)->number, test_value (solution, "plant.own_consumption") / 1e3, 1e-9);
        return;
      }
  g_assert_not_reached ();
}

int
main (int argc, char **argv)
{
  g_test_init (&argc, &argv, NULL);
  g_test_add_func ("/draw/tables/the-summary-adds-up", test_the_summary_adds_up);
  g_test_add_func ("/draw/tables/the-higher-heating-value", test_the_higher_heating_value_is_the_boilers);
  g_test_add_func ("/draw/tables/not-solved", test_what_is_not_solved_has_no_performance);
  g_test_add_func ("/draw/tables/every-table-reads-back", test_every_table_of_every_plant_reads_back);
  g_test_add_func ("/draw/tables/sources", test_assumed_values_have_their_sources);
  g_test_add_func ("/draw/tables/unusual-assumptions", test_an_unusual_assumption_does_not_borrow_the_source);
  g_test_add_func ("/draw/tables/small-powers", test_small_powers_keep_their_digits);
  return g_test_run ();
}
