/* The ledger as text: columns line up and say what the cells say.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "draw/export.h"
#include "draw/ledger.h"
#include "../engine/plants.h"
#include <string.h>

static HlSolution *
solve (void)
{
  HlPlant *plant = test_plant (test_industrial_plant);
  HlSolution *solution = hl_solve (plant, NULL);
  test_assert_solved (solution);
  hl_plant_unref (plant);
  return solution;
}

/* The @n characters at character @at of a line, short where the line ends. */
static char *
slice (const char *line, glong at, glong n)
{
  glong length = g_utf8_strlen (line, -1);
  return at >= length ? g_strdup ("") : g_utf8_substring (line, at, MIN (at + n, length));
}

static void
test_columns_line_up (void)
{
  g_autoptr (HlSolution) solution = solve ();
  for (int units = 0; units < HL_N_UNIT_SETS; units++)
    {
      g_autofree char *text = hl_ledger_text (solution, (HlUnitSet) units);
      g_auto (GStrv) lines = g_strsplit (text, "\n", -1);
      guint n_streams = hl_plant_n_streams (hl_solution_plant (solution));
      glong at = 0;
      g_assert_cmpuint (g_strv_length (lines), ==, n_streams + 3);
      g_assert_cmpstr (lines[n_streams + 2], ==, "");
      for (guint i = 0; i < n_streams + 2; i++)
        g_assert_false (g_str_has_suffix (lines[i], " "));
      for (guint column = 0; column < hl_ledger_n_columns (); column++)
        {
          const HlLedgerColumn *kind = hl_ledger_column (column);
          glong width = MAX (g_utf8_strlen (kind->name, -1), g_utf8_strlen (hl_units_label (kind->dimension, (HlUnitSet) units), -1));
          for (guint i = 0; i < n_streams; i++)
            {
              g_autofree char *cell = hl_ledger_cell (solution, i, column, (HlUnitSet) units, NULL);
              width = MAX (width, g_utf8_strlen (cell, -1));
            }
          for (guint i = 0; i < n_streams; i++)
            {
              g_autofree char *cell = hl_ledger_cell (solution, i, column, (HlUnitSet) units, NULL), *found = slice (lines[i + 2], at, width);
              if (!kind->is_text && *cell != '\0')
                g_assert_true (g_str_has_suffix (found, cell));
              else if (kind->is_text)
                g_assert_true (g_str_has_prefix (found, cell));
              g_assert_cmpstr (g_strstrip (found), ==, cell);
            }
          at += width + 2;
        }
    }
}

static void
test_an_empty_plant_has_headings_only (void)
{
  g_autoptr (HlPlant) plant = hl_plant_new ();
  g_autoptr (HlSolution) solution = hl_solve (plant, NULL);
  g_autofree char *text = hl_ledger_text (solution, HL_UNITS_METRIC);
  g_auto (GStrv) lines = g_strsplit (text, "\n", -1);
  g_assert_cmpuint (g_strv_length (lines), ==, 3);
  g_assert_nonnull (strstr (lines[0], "Pressure"));
  g_assert_nonnull (strstr (lines[1], "bar"));
}

int
main (int argc, char **argv)
{
  g_test_init (&argc, &argv, NULL);
  g_test_add_func ("/draw/ledger-text/columns-line-up", test_columns_line_up);
  g_test_add_func ("/draw/ledger-text/an-empty-plant", test_an_empty_plant_has_headings_only);
  return g_test_run ();
}
