/* Worked examples of textbooks, solved as plants and compared with the printed answers.
 * The examples stand in data/steam-textbook.json, set down from memory of the books named there; `recomputed` holds the same
 * cycles calculated state by state with IAPWS-IF97 by Debian's python3-iapws.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "plants.h"
#include "validation.h"
#include <json-glib/json-glib.h>
#include <math.h>

static JsonParser *parser;

static JsonObject *
example (const char *id)
{
  JsonArray *list = json_node_get_array (json_parser_get_root (parser));
  for (guint k = 0; k < json_array_get_length (list); k++)
    {
      JsonObject *object = json_array_get_object_element (list, k);
      if (g_str_equal (json_object_get_string_member (object, "id"), id))
        return object;
    }
  g_error ("no example %s", id);
}

static double
number (const char *id, const char *part, const char *key)
{
  JsonObject *object = json_object_get_object_member (example (id), part);
  if (!json_object_has_member (object, key))
    g_error ("%s has no %s.%s", id, part, key);
  return json_object_get_double_member (object, key);
}

static const struct { const char *key, *words, *unit; } words[] = {
  { "efficiency", "cycle efficiency", "1" }, { "x_exhaust", "exhaust quality", "1" }, { "w_net_kJ_kg", "net work", "kJ/kg" }, { "q_in_kJ_kg", "heat added", "kJ/kg" },
  { "net_power_MW", "net power", "MW" }, { "w_t", "turbine work", "kJ/kg" }, { "w_p", "pump work", "kJ/kg" }, { "q_in", "heat added", "kJ/kg" },
  { "extraction_fraction", "extracted fraction", "1" }, { "y", "fraction to the closed heater", "1" }, { "z", "fraction to the open heater", "1" },
  { "m_kg_h", "steam flow", "kg/h" }, { "q_in_MW", "heat added", "MW" }, { "q_out_MW", "heat rejected", "MW" }, { "cooling_water_kg_h", "cooling water", "kg/h" },
  { "y1", "first extracted fraction", "1" }, { "y2", "second extracted fraction", "1" }, { "power_MW", "power", "MW" }, { "utilization", "utilisation", "1" },
};

static guint
word_of (const char *key)
{
  for (guint k = 0; k < G_N_ELEMENTS (words); k++)
    if (g_str_equal (words[k].key, key))
      return k;
  g_error ("no words for %s", key);
}

/* Within @part of the value in @column of the example. */
static void
compare_with (const char *id, const char *key, const char *column, double value, double part)
{
  gboolean is_book = g_str_equal (column, "book_answer");
  double published = number (id, column, key);
  g_autofree char *source = is_book ? g_strdup_printf ("%s; %s", json_object_get_string_member (example (id), "source"), json_object_get_string_member (example (id), "read"))
                                    : g_strdup ("state by state with IAPWS-IF97 of the Python package iapws");
  guint k = word_of (key);
  validate ("Steam cycles", json_object_get_string_member (example (id), "title"), source, words[k].words, words[k].unit, published, value, part * fabs (published), is_book ? 4 : 6);
}

/* Against the recalculation to 2e-5; against the printed answer to @printed, half a per cent where not said otherwise. */
static void
compare (const char *id, const char *key, double value, double printed)
{
  compare_with (id, key, "recomputed", value, 2e-5);
  if (json_object_has_member (json_object_get_object_member (example (id), "book_answer"), key))
    compare_with (id, key, "book_answer", value, printed);
}

static HlSolution *
solve (const char *text)
{
  g_autoptr (HlPlant) plant = test_plant (text);
  HlSolution *solution = hl_solve (plant, NULL);
  double mass, energy;
  test_assert_solved (solution);
  hl_solution_balances (solution, &mass, &energy);
  g_assert_cmpfloat (fabs (mass), <, 1e-9);
  g_assert_cmpfloat (fabs (energy), <, 1e-9);
  return solution;
}

#define SIMPLE(live, exhaust, eta) \
  "heat_input Q1 pressure_loss=0 " live "\n" \
  "turbine T1 exhaust.p=" exhaust " isentropic_efficiency=" eta " mechanical_efficiency=1\n" \
  "pump P1 isentropic_efficiency=" eta " motor_efficiency=1\n" \
  "Q1.steam > T1.inlet\nT1.exhaust > C1.steam\nC1.condensate > P1.inlet\nP1.outlet > Q1.feed\n"
#define NO_COOLING "condenser C1 cooling:1 subcooling=0\n"

static void
test_simple_ideal_cycle (void)
{
  g_autoptr (HlSolution) s = solve (NO_COOLING SIMPLE ("steam.p=3e6 steam.T=623.15 steam.m=1", "75e3", "1") "plant other_consumption_fraction=0\n");
  compare ("cb-10-1", "efficiency", test_value (s, "plant.cycle_efficiency"), 5e-3);
  compare ("cb-10-1", "x_exhaust", test_value (s, "T1.exhaust.x"), 5e-3);
  compare ("cb-10-1", "w_net_kJ_kg", test_value (s, "plant.net_power") / 1e3, 5e-3);
  compare ("cb-10-1", "q_in_kJ_kg", test_value (s, "plant.heat_input") / 1e3, 5e-3);
}

static void
test_low_condenser_pressure (void)
{
  g_autoptr (HlSolution) s = solve (NO_COOLING SIMPLE ("steam.p=3e6 steam.T=623.15 steam.m=1", "10e3", "1") "plant other_consumption_fraction=0\n");
  compare ("cb-10-3a", "efficiency", test_value (s, "plant.cycle_efficiency"), 5e-3);
  compare ("cb-10-3a", "x_exhaust", test_value (s, "T1.exhaust.x"), 5e-3);
}

/* Pipes between all machines; pressures and temperatures at both ends given, heat losses and subcooling found. */
static void
test_cycle_with_losses (void)
{
  g_autoptr (HlSolution) s = solve (
    "heat_input Q1 steam.p=15.2e6 steam.T=898.15 feed.p=15.9e6 feed.T=308.15\n"
    "pipe L1\npipe L2 heat_loss=0\npipe L3\n"
    "turbine T1 inlet.p=15e6 inlet.T=873.15 exhaust.p=10e3 isentropic_efficiency=0.87 mechanical_efficiency=1 inlet.m=15\n"
    "condenser C1 cooling:1\n"
    "pump P1 inlet.p=9e3 inlet.T=311.15 outlet.p=16e6 isentropic_efficiency=0.85 motor_efficiency=1\n"
    "Q1.steam > L1.inlet\nL1.outlet > T1.inlet\nT1.exhaust > C1.steam\nC1.condensate > L2.inlet\nL2.outlet > P1.inlet\nP1.outlet > L3.inlet\nL3.outlet > Q1.feed\n"
    "plant other_consumption_fraction=0\n");
  compare ("cb-10-2", "efficiency", test_value (s, "plant.cycle_efficiency"), 5e-3);
  compare ("cb-10-2", "net_power_MW", test_value (s, "plant.net_power") / 1e6, 5e-3);
  compare ("cb-10-2", "w_t", test_value (s, "T1.power") / 15e3, 5e-3);
  compare ("cb-10-2", "w_p", test_value (s, "P1.power") / 15e3, 5e-3);
  compare ("cb-10-2", "q_in", test_value (s, "Q1.heat") / 15e3, 5e-3);
  g_assert_cmpfloat (test_value (s, "L1.heat_loss"), >, 0.0);
  g_assert_cmpfloat (test_value (s, "C1.subcooling"), >, 0.0);
}

static void
test_open_heater (void)
{
  g_autoptr (HlSolution) s = solve (
    "heat_input Q1 pressure_loss=0 steam.p=15e6 steam.T=873.15 steam.m=1\n"
    "turbine T1 extractions:1 exhaust.p=10e3 isentropic_efficiency=1 mechanical_efficiency=1\n" NO_COOLING
    "pump P1 isentropic_efficiency=1 motor_efficiency=1\npump P2 isentropic_efficiency=1 motor_efficiency=1\n"
    "open_heater D1 steam.p=1.2e6 outlet_subcooling=0\n"
    "Q1.steam > T1.inlet\nT1.extraction1 > D1.steam\nT1.exhaust > C1.steam\nC1.condensate > P1.inlet\nP1.outlet > D1.inlet1\nD1.outlet > P2.inlet\nP2.outlet > Q1.feed\n"
    "plant other_consumption_fraction=0\n");
  compare ("cb-10-5", "extraction_fraction", test_value (s, "T1.extraction1.m"), 5e-3);
  compare ("cb-10-5", "efficiency", test_value (s, "plant.cycle_efficiency"), 5e-3);
}

/* The drain of the closed heater is pumped into the feed line; the feedwater leaves at the pumped drain's temperature: a tie. */
static void
test_reheat_closed_and_open_heater (void)
{
  HlPlant *plant = test_plant (
    "heat_input Q1 reheats:1 pressure_loss=0 reheat_pressure_loss1=0 steam.p=15e6 steam.T=873.15 steam.m=1 hot_reheat1.T=873.15\n"
    "turbine T1 extractions:0 exhaust.p=4e6 isentropic_efficiency=1 mechanical_efficiency=1\nsplitter X1\n"
    "turbine T2 extractions:1 exhaust.p=10e3 isentropic_efficiency=1 mechanical_efficiency=1\n" NO_COOLING
    "pump P1 isentropic_efficiency=1 motor_efficiency=1\npump P2 isentropic_efficiency=1 motor_efficiency=1\npump P3 isentropic_efficiency=1 motor_efficiency=1\n"
    "open_heater D1 steam.p=0.5e6 outlet_subcooling=0\nclosed_heater H1 drain_subcooling=0 feed_pressure_loss=0\nmixer M1\n"
    "Q1.steam > T1.inlet\nT1.exhaust > X1.inlet\nX1.outlet1 > Q1.cold_reheat1\nX1.outlet2 > H1.steam\nQ1.hot_reheat1 > T2.inlet\n"
    "T2.extraction1 > D1.steam\nT2.exhaust > C1.steam\nC1.condensate > P1.inlet\nP1.outlet > D1.inlet1\nD1.outlet > P2.inlet\nP2.outlet > H1.feed_inlet\n"
    "H1.feed_outlet > M1.inlet1\nH1.drain > P3.inlet\nP3.outlet > M1.inlet2\nM1.outlet > Q1.feed\n"
    "plant other_consumption_fraction=0\n");
  HlAddress target = hl_address_component (g_intern_static_string ("H1"), g_intern_static_string ("feed_outlet.T"));
  HlAddress of = hl_address_component ("P3", "outlet.T");
  HlValue tie = { .origin = HL_ORIGIN_TIED, .tie = hl_tie_linear (&of, 1.0, 0.0) };
  g_autoptr (GError) error = NULL;
  g_autoptr (HlPlant) tied = hl_plant_with_value (plant, &target, &tie, &error);
  g_assert_no_error (error);
  hl_plant_unref (plant);
  g_autoptr (HlSolution) s = hl_solve (tied, NULL);
  /* The feedwater leaves hotter than the shell's saturation, and yet cooler than its steam: no zone crosses. */
  test_assert_solved (s);
  g_assert_cmpfloat (test_value (s, "H1.terminal_difference"), <, 0.0);
  compare ("cb-10-6", "y", test_value (s, "H1.steam.m"), 5e-3);
  compare ("cb-10-6", "z", test_value (s, "D1.steam.m"), 5e-3);
  compare ("cb-10-6", "efficiency", test_value (s, "plant.cycle_efficiency"), 5e-3);
}

static void
test_sizing_by_net_power (void)
{
  g_autoptr (HlSolution) s = solve ("condenser C1 subcooling=0 cooling_inlet_T=288.15 cooling_rise=20 cooling_p=101325\n"
    SIMPLE ("steam.p=8e6 steam.x=1", "8e3", "0.85") "plant other_consumption_fraction=0 net_power=100e6\n");
  compare ("ms-8-2", "efficiency", test_value (s, "plant.cycle_efficiency"), 5e-3);
  compare ("ms-8-2", "m_kg_h", test_value (s, "T1.inlet.m") * 3600.0, 5e-3);
  compare ("ms-8-2", "q_in_MW", test_value (s, "plant.heat_input") / 1e6, 5e-3);
  compare ("ms-8-2", "q_out_MW", test_value (s, "plant.heat_rejected") / 1e6, 5e-3);
  compare ("ms-8-2", "cooling_water_kg_h", test_value (s, "C1.cooling_flow") * 3600.0, 5e-3);
}

static void
test_reheat_drain_trapped (void)
{
  g_autoptr (HlSolution) s = solve (
    "heat_input Q1 reheats:1 pressure_loss=0 reheat_pressure_loss1=0 steam.p=8e6 steam.T=753.15 hot_reheat1.T=713.15\n"
    "turbine T1 extractions:1 extraction1.p=2e6 exhaust.p=0.7e6 isentropic_efficiency=1 mechanical_efficiency=1\n"
    "turbine T2 extractions:1 exhaust.p=8e3 isentropic_efficiency=1 mechanical_efficiency=1\n" NO_COOLING
    "pump P1 isentropic_efficiency=1 motor_efficiency=1\npump P2 isentropic_efficiency=1 motor_efficiency=1\n"
    "open_heater D1 inlets:2 steam.p=0.3e6 outlet_subcooling=0\nclosed_heater H1 drain_subcooling=0 feed_pressure_loss=0 feed_outlet.T=478.15\nvalve V1\n"
    "Q1.steam > T1.inlet\nT1.extraction1 > H1.steam\nT1.exhaust > Q1.cold_reheat1\nQ1.hot_reheat1 > T2.inlet\nT2.extraction1 > D1.steam\nT2.exhaust > C1.steam\n"
    "C1.condensate > P1.inlet\nP1.outlet > D1.inlet1\nD1.outlet > P2.inlet\nP2.outlet > H1.feed_inlet\nH1.feed_outlet > Q1.feed\nH1.drain > V1.inlet\nV1.outlet > D1.inlet2\n"
    "plant other_consumption_fraction=0 net_power=100e6\n");
  double live = test_value (s, "T1.inlet.m");
  /* The book reads the feedwater's enthalpy from another table: see the note of the example. */
  compare ("ms-8-6", "efficiency", test_value (s, "plant.cycle_efficiency"), 2e-2);
  compare ("ms-8-6", "m_kg_h", live * 3600.0, 2e-2);
  compare ("ms-8-6", "y1", test_value (s, "H1.steam.m") / live, 2e-2);
  compare ("ms-8-6", "y2", test_value (s, "D1.steam.m") / live, 2e-2);
}

static void
test_cogeneration_without_process_heat (void)
{
  g_autoptr (HlSolution) s = solve (NO_COOLING SIMPLE ("steam.p=7e6 steam.T=773.15 steam.m=15", "5e3", "1") "plant other_consumption_fraction=0\n");
  compare ("cb-10-8b", "power_MW", test_value (s, "plant.net_power") / 1e6, 5e-3);
  compare ("cb-10-8b", "efficiency", test_value (s, "plant.cycle_efficiency"), 5e-3);
  compare_with ("cb-10-8b", "utilization", "book_answer", test_value (s, "plant.cycle_efficiency"), 5e-3);
}

/* Cengel, Boles: Thermodynamics, An Engineering Approach, chapter 10, Example 10-8 (c), from memory of the book: of 15 kg/s, 10 %
 * go past the turbine through a throttle, 70 % are extracted at 500 kPa, the process heater is left as saturated liquid at
 * 500 kPa; printed: 26.2 MW of process heat. */
static void
test_cogeneration_with_process_heat (void)
{
  g_autoptr (HlSolution) s = solve (
    "heat_input Q1 pressure_loss=0 steam.p=7e6 steam.T=773.15 steam.m=15\nsplitter X1 fraction1=0.9\nvalve V1\n"
    "turbine T1 extractions:1 extraction1.m=10.5 extraction1.p=0.5e6 exhaust.p=5e3 isentropic_efficiency=1 mechanical_efficiency=1\nmixer M1\n"
    "steam_user U1 return_fraction=1 condensate.p=0.5e6 condensate.x=0\n" NO_COOLING
    "pump P1 isentropic_efficiency=1 motor_efficiency=1\npump P2 isentropic_efficiency=1 motor_efficiency=1\nmixer M2\n"
    "Q1.steam > X1.inlet\nX1.outlet1 > T1.inlet\nX1.outlet2 > V1.inlet\nV1.outlet > M1.inlet1\nT1.extraction1 > M1.inlet2\nM1.outlet > U1.steam\n"
    "T1.exhaust > C1.steam\nC1.condensate > P1.inlet\nP1.outlet > M2.inlet1\nU1.condensate > P2.inlet\nP2.outlet > M2.inlet2\nM2.outlet > Q1.feed\n"
    "plant other_consumption_fraction=0\n");
  validate ("Steam cycles", "Cogeneration with process heat", "Cengel, Boles: Thermodynamics, An Engineering Approach, chapter 10, Example 10-8 (c); from memory of the book",
            "process heat", "MW", 26.2, test_value (s, "U1.heat") / 1e6, 0.05, 4);
  test_assert_near (test_value (s, "plant.heat_delivered"), test_value (s, "U1.heat"), 1e-12);
  test_assert_near (test_value (s, "plant.utilisation"),
                    (test_value (s, "plant.net_power") + test_value (s, "plant.heat_delivered")) / test_value (s, "plant.heat_input"), 1e-12);
}

int
main (int argc, char **argv)
{
  g_autoptr (GError) error = NULL;
  g_test_init (&argc, &argv, NULL);
  g_autofree char *path = g_test_build_filename (G_TEST_DIST, "outside", "data", "steam-textbook.json", NULL);
  parser = json_parser_new ();
  json_parser_load_from_file (parser, path, &error);
  g_assert_no_error (error);
  g_test_add_func ("/outside/textbook/simple-ideal-cycle", test_simple_ideal_cycle);
  g_test_add_func ("/outside/textbook/low-condenser-pressure", test_low_condenser_pressure);
  g_test_add_func ("/outside/textbook/cycle-with-losses", test_cycle_with_losses);
  g_test_add_func ("/outside/textbook/open-heater", test_open_heater);
  g_test_add_func ("/outside/textbook/reheat-closed-and-open-heater", test_reheat_closed_and_open_heater);
  g_test_add_func ("/outside/textbook/sizing-by-net-power", test_sizing_by_net_power);
  g_test_add_func ("/outside/textbook/reheat-drain-trapped", test_reheat_drain_trapped);
  g_test_add_func ("/outside/textbook/cogeneration-without-process-heat", test_cogeneration_without_process_heat);
  g_test_add_func ("/outside/textbook/cogeneration-with-process-heat", test_cogeneration_with_process_heat);
  int status = g_test_run ();
  g_object_unref (parser);
  return status;
}
