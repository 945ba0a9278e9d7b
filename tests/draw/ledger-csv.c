/* The ledger as CSV: read back by a reader of RFC 4180 it gives the solution's numbers again.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "draw/export.h"
#include "draw/ledger.h"
#include "../engine/plants.h"
#include <locale.h>
#include <math.h>
#include <string.h>

/* Records of fields, by the grammar of RFC 4180, section 2: anything else ends the test. */
static GPtrArray *
parse (const char *csv)
{
  GPtrArray *records = g_ptr_array_new_with_free_func ((GDestroyNotify) g_strfreev);
  GPtrArray *fields = g_ptr_array_new ();
  for (const char *c = csv; *c != '\0';)
    {
      GString *field = g_string_new (NULL);
      if (*c == '"')
        {
          for (c++; !(c[0] == '"' && c[1] != '"'); c += c[0] == '"' ? 2 : 1)
            {
              g_assert_true (*c != '\0');
              g_string_append_c (field, *c);
            }
          c++;
        }
      else
        for (; *c != ',' && *c != '\r' && *c != '\0'; c++)
          {
            g_assert_true (*c != '"' && *c != '\n');
            g_string_append_c (field, *c);
          }
      g_ptr_array_add (fields, g_string_free (field, FALSE));
      if (*c == ',')
        {
          c++;
          continue;
        }
      g_assert_true (c[0] == '\r' && c[1] == '\n');
      c += 2;
      g_ptr_array_add (fields, NULL);
      g_ptr_array_add (records, g_ptr_array_free (fields, FALSE));
      fields = g_ptr_array_new ();
    }
  g_assert_cmpuint (fields->len, ==, 0);
  g_ptr_array_free (fields, TRUE);
  return records;
}

static HlSolution *
solve (void)
{
  HlPlant *plant = test_plant_set (test_plant (test_industrial_plant), "U1.heat", 8e6);
  HlSolution *solution = hl_solve (plant, NULL);
  test_assert_solved (solution);
  hl_plant_unref (plant);
  return solution;
}

static void
assert_numbers_come_back (const HlSolution *solution, const char *csv, HlUnitSet units)
{
  g_autoptr (GPtrArray) records = parse (csv);
  guint n_streams = hl_plant_n_streams (hl_solution_plant (solution));
  g_assert_cmpuint (records->len, ==, n_streams + 1);
  for (guint stream = 0; stream <= n_streams; stream++)
    {
      char **fields = g_ptr_array_index (records, stream);
      g_assert_cmpuint (g_strv_length (fields), ==, hl_ledger_n_columns ());
      for (guint column = 0; column < hl_ledger_n_columns (); column++)
        {
          const HlLedgerColumn *kind = hl_ledger_column (column);
          g_autofree char *heading = hl_ledger_heading (column, units);
          double value;
          g_autofree char *text = stream > 0 ? hl_ledger_cell (solution, stream - 1, column, units, &value) : NULL;
          if (stream == 0)
            g_assert_cmpstr (fields[column], ==, heading);
          else if (kind->is_text)
            g_assert_cmpstr (fields[column], ==, text);
          else if (isnan (value))
            g_assert_cmpstr (fields[column], ==, "");
          else
            {
              char *end;
              double shown = g_ascii_strtod (fields[column], &end), back = hl_units_from_display (shown, kind->dimension, units);
              g_assert_true (*end == '\0' && end != fields[column]);
              /* Ten significant digits of the number shown, which for a temperature in degrees is less than in kelvin. */
              g_assert_cmpfloat (fabs (back - value), <=, 1e-9 * fabs (value));
            }
        }
    }
}

static void
test_numbers_come_back (void)
{
  g_autoptr (HlSolution) solution = solve ();
  for (int units = 0; units < HL_N_UNIT_SETS; units++)
    {
      g_autofree char *csv = hl_ledger_csv (solution, (HlUnitSet) units);
      assert_numbers_come_back (solution, csv, (HlUnitSet) units);
    }
}

/* "given p, T" holds a comma; a medium of a later version, which this one does not know, may be called anything. */
static void
test_commas_and_quotes_are_quoted (void)
{
  g_autoptr (HlSolution) solution = solve ();
  HlStream *stream = hl_stream_copy (hl_plant_stream (hl_solution_plant (solution), 0));
  g_autoptr (HlPlant) plant = NULL;
  g_autoptr (HlSolution) again = NULL;
  g_autofree char *csv = NULL, *known = hl_ledger_csv (solution, HL_UNITS_METRIC);
  g_assert_nonnull (strstr (known, ",\"given p, T\"\r\n"));
  stream->medium = g_intern_string ("brine \"A\", cold");
  plant = hl_plant_with_stream (hl_solution_plant (solution), stream);
  again = hl_solve (plant, NULL);
  csv = hl_ledger_csv (again, HL_UNITS_METRIC);
  g_assert_nonnull (strstr (csv, ",\"brine \"\"A\"\", cold\","));
  assert_numbers_come_back (again, csv, HL_UNITS_METRIC);
}

static void
test_point_stays_whatever_the_locale (void)
{
  static const char *const locales[] = { "de_DE.UTF-8", "fr_FR.UTF-8", "de_DE.utf8", "fr_FR.utf8", "de_AT.UTF-8", "nl_NL.UTF-8" };
  g_autoptr (HlSolution) solution = solve ();
  g_autofree char *before = hl_ledger_csv (solution, HL_UNITS_METRIC), *after = NULL;
  const char *chosen = NULL;
  for (guint i = 0; i < G_N_ELEMENTS (locales) && chosen == NULL; i++)
    chosen = setlocale (LC_NUMERIC, locales[i]);
  if (chosen == NULL)
    {
      g_test_skip ("no locale with a decimal comma is installed");
      return;
    }
  after = hl_ledger_csv (solution, HL_UNITS_METRIC);
  setlocale (LC_NUMERIC, "C");
  g_assert_cmpstr (after, ==, before);
}

static void
test_an_empty_plant_has_a_heading_only (void)
{
  g_autoptr (HlPlant) plant = hl_plant_new ();
  g_autoptr (HlSolution) solution = hl_solve (plant, NULL);
  g_autofree char *csv = hl_ledger_csv (solution, HL_UNITS_METRIC);
  g_autoptr (GPtrArray) records = parse (csv);
  g_assert_cmpuint (records->len, ==, 1);
  g_assert_true (g_str_has_suffix (csv, "Origin\r\n"));
}

int
main (int argc, char **argv)
{
  g_test_init (&argc, &argv, NULL);
  g_test_add_func ("/draw/ledger-csv/numbers-come-back", test_numbers_come_back);
  g_test_add_func ("/draw/ledger-csv/commas-and-quotes", test_commas_and_quotes_are_quoted);
  g_test_add_func ("/draw/ledger-csv/point-stays-whatever-the-locale", test_point_stays_whatever_the_locale);
  g_test_add_func ("/draw/ledger-csv/an-empty-plant", test_an_empty_plant_has_a_heading_only);
  return g_test_run ();
}
