/* The ledger: headings with units, cells as the trade rounds them, words for phase and origin.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "draw/ledger.h"
#include "../engine/plants.h"
#include <math.h>

typedef struct { HlPlant *plant; HlSolution *solution; } Fixture;

static void
set_up (Fixture *fixture, gconstpointer data)
{
  (void) data;
  fixture->plant = test_plant_set (test_plant (test_industrial_plant), "U1.heat", 8e6);
  fixture->solution = hl_solve (fixture->plant, NULL);
  test_assert_solved (fixture->solution);
}

static void
tear_down (Fixture *fixture, gconstpointer data)
{
  (void) data;
  hl_solution_unref (fixture->solution);
  hl_plant_unref (fixture->plant);
}

static guint
column_of (const char *key)
{
  for (guint i = 0; i < hl_ledger_n_columns (); i++)
    if (g_str_equal (hl_ledger_column (i)->key, key))
      return i;
  g_error ("no column %s", key);
}

static guint
stream_of (const Fixture *fixture, const char *component, const char *port)
{
  const HlStream *stream = hl_plant_stream_at (fixture->plant, component, port);
  g_assert_nonnull (stream);
  return (guint) hl_plant_stream_index (fixture->plant, stream->id);
}

static void
assert_cell (const Fixture *fixture, guint stream, const char *key, const char *expected)
{
  g_autofree char *text = hl_ledger_cell (fixture->solution, stream, column_of (key), HL_UNITS_METRIC, NULL);
  g_assert_cmpstr (text, ==, expected);
}

static void
test_headings_name_the_units (Fixture *fixture, gconstpointer data)
{
  static const char *const keys[] = { "id", "from", "to", "medium", "phase", "m", "p", "T", "x", "h", "s", "e", "v", "volume_flow", "origin" };
  static const char *const metric[] = {
    "Stream", "From", "To", "Medium", "Phase", "Flow [kg/s]", "Pressure [bar]", "Temperature [°C]", "Quality", "Enthalpy [kJ/kg]",
    "Entropy [kJ/(kg K)]", "Exergy [kJ/kg]", "Specific volume [m³/kg]", "Volume flow [m³/h]", "Origin",
  };
  static const char *const us[] = {
    "Stream", "From", "To", "Medium", "Phase", "Flow [klb/h]", "Pressure [psia]", "Temperature [°F]", "Quality", "Enthalpy [Btu/lb]",
    "Entropy [Btu/(lb °F)]", "Exergy [Btu/lb]", "Specific volume [ft³/lb]", "Volume flow [ft³/min]", "Origin",
  };
  (void) fixture;
  (void) data;
  g_assert_cmpuint (hl_ledger_n_columns (), ==, G_N_ELEMENTS (keys));
  for (guint i = 0; i < G_N_ELEMENTS (keys); i++)
    {
      g_autofree char *in_metric = hl_ledger_heading (i, HL_UNITS_METRIC), *in_us = hl_ledger_heading (i, HL_UNITS_US);
      g_assert_cmpstr (hl_ledger_column (i)->key, ==, keys[i]);
      g_assert_cmpstr (in_metric, ==, metric[i]);
      g_assert_cmpstr (in_us, ==, us[i]);
    }
}

static void
test_cells_say_what_the_solution_holds (Fixture *fixture, gconstpointer data)
{
  (void) data;
  for (guint stream = 0; stream < hl_plant_n_streams (fixture->plant); stream++)
    {
      HlStreamResult result;
      hl_solution_stream (fixture->solution, stream, &result);
      const struct { const char *key; double value; } cells[] = {
        { "m", result.m }, { "p", result.state.p }, { "T", result.state.T }, { "x", result.state.x }, { "h", result.state.h },
        { "s", result.state.s }, { "e", result.e }, { "v", result.state.v }, { "volume_flow", result.m * result.state.v },
      };
      for (guint i = 0; i < G_N_ELEMENTS (cells); i++)
        for (int units = 0; units < HL_N_UNIT_SETS; units++)
          {
            double value;
            guint column = column_of (cells[i].key);
            g_autofree char *text = hl_ledger_cell (fixture->solution, stream, column, (HlUnitSet) units, &value);
            if (isnan (cells[i].value))
              {
                g_assert_true (isnan (value));
                g_assert_cmpstr (text, ==, "");
                continue;
              }
            g_assert_cmpfloat (fabs (value - cells[i].value), <=, 1e-12 * fabs (cells[i].value));
            /* The text is that number, rounded: to a thousandth, or to half a unit of its last decimal where that is more. */
            double shown = hl_units_to_display (value, hl_ledger_column (column)->dimension, (HlUnitSet) units);
            g_assert_cmpfloat (fabs (g_ascii_strtod (text, NULL) - shown), <=, fmax (1e-3 * fabs (shown), 0.0501));
          }
    }
}

static void
test_words_of_live_steam_and_condensate (Fixture *fixture, gconstpointer data)
{
  guint live = stream_of (fixture, "B1", "steam"), condensate = stream_of (fixture, "C1", "condensate");
  guint exhaust = stream_of (fixture, "T1", "exhaust"), feed = stream_of (fixture, "B1", "feed"), user = stream_of (fixture, "T1", "extraction1");
  (void) data;
  assert_cell (fixture, live, "id", "1");
  assert_cell (fixture, live, "from", "B1 steam outlet");
  assert_cell (fixture, user, "from", "T1 extraction 1");
  assert_cell (fixture, live, "medium", "Water and steam");
  assert_cell (fixture, live, "p", "65.00");
  assert_cell (fixture, live, "T", "485.0");
  assert_cell (fixture, live, "x", "");
  assert_cell (fixture, live, "phase", "vapour");
  assert_cell (fixture, live, "origin", "given p, T");
  assert_cell (fixture, exhaust, "phase", "wet steam");
  assert_cell (fixture, condensate, "phase", "saturated liquid");
  assert_cell (fixture, condensate, "x", "0.000");
  assert_cell (fixture, condensate, "origin", "found");
  assert_cell (fixture, feed, "phase", "liquid");
}

/* A plant that cannot be solved leaves cells empty, not wrong. */
static void
test_unknown_cells_are_empty (Fixture *fixture, gconstpointer data)
{
  g_autoptr (HlPlant) plant = test_plant_let_go (test_plant (test_industrial_plant), "plant.gross_power");
  g_autoptr (HlSolution) solution = hl_solve (plant, NULL);
  double value;
  g_autofree char *text = hl_ledger_cell (solution, 0, column_of ("m"), HL_UNITS_METRIC, &value);
  (void) fixture;
  (void) data;
  g_assert_false (hl_solution_is_solved (solution));
  g_assert_true (isnan (value));
  g_assert_cmpstr (text, ==, "");
}

int
main (int argc, char **argv)
{
  g_test_init (&argc, &argv, NULL);
#define ADD(path, function) g_test_add ("/draw/ledger/" path, Fixture, NULL, set_up, function, tear_down)
  ADD ("headings-name-the-units", test_headings_name_the_units);
  ADD ("cells-say-what-the-solution-holds", test_cells_say_what_the_solution_holds);
  ADD ("words", test_words_of_live_steam_and_condensate);
  ADD ("unknown-cells-are-empty", test_unknown_cells_are_empty);
  return g_test_run ();
}
