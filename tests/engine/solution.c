/* What is read from a solution: values by address, summary, explanations, processes.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "plants.h"
#include <math.h>
#include <string.h>

static HlSolution *
solve (const char *text)
{
  g_autoptr (HlPlant) plant = test_plant (text);
  return hl_solve (plant, NULL);
}

static char *
explain (const HlSolution *s, const char *text)
{
  HlAddress address;
  g_autoptr (GError) error = NULL;
  g_assert_true (hl_address_parse (text, hl_solution_plant (s), &address, &error));
  return hl_solution_explain (s, &address);
}

/* The three addresses of one state agree, for every letter. */
static void
test_a_state_has_three_addresses (void)
{
  g_autoptr (HlSolution) s = solve (test_simple_loop);
  static const char *const letters[] = { "m", "p", "T", "h", "s", "v" };
  for (guint k = 0; k < G_N_ELEMENTS (letters); k++)
    {
      g_autofree char *from = g_strconcat ("T1.exhaust.", letters[k], NULL), *to = g_strconcat ("C1.steam.", letters[k], NULL);
      g_autofree char *stream = g_strconcat ("stream:2.", letters[k], NULL);
      test_assert_near (test_value (s, from), test_value (s, stream), 0.0);
      test_assert_near (test_value (s, to), test_value (s, stream), 0.0);
    }
  test_assert_near (test_value (s, "T1.exhaust.x"), 1.0 - test_value (s, "T1.exhaust_moisture"), 1e-12);
  g_assert_true (isnan (test_value (s, "T1.inlet.x")));      /* one phase: no quality */
  /* Saturated liquid is so on paper, whichever way the last digit rounds. */
  g_assert_cmpfloat (test_value (s, "C1.condensate.x"), ==, 0.0);
}

static void
test_results_by_their_names (void)
{
  g_autoptr (HlSolution) s = solve (test_simple_loop);
  double net = test_value (s, "plant.net_power"), gross = test_value (s, "plant.gross_power"), heat = test_value (s, "plant.heat_input");
  test_assert_near (gross, test_value (s, "G1.power"), 1e-12);
  test_assert_near (net, gross - test_value (s, "P1.motor_power"), 1e-12);
  test_assert_near (test_value (s, "plant.gross_efficiency"), gross / heat, 1e-12);
  test_assert_near (test_value (s, "plant.net_efficiency_lhv"), net / heat, 1e-12);
  test_assert_near (test_value (s, "plant.cycle_efficiency"), (test_value (s, "T1.power") - test_value (s, "P1.power")) / heat, 1e-12);
  test_assert_near (test_value (s, "plant.heat_rate"), heat / gross, 1e-12);
  test_assert_near (test_value (s, "plant.steam_rate"), test_value (s, "T1.inlet.m") / gross, 1e-12);
  test_assert_near (test_value (s, "plant.back_work_ratio"), test_value (s, "P1.power") / test_value (s, "T1.power"), 1e-12);
  test_assert_near (test_value (s, "plant.carnot_efficiency"), 1.0 - test_value (s, "T1.exhaust.T") / 758.15, 1e-12);
  test_assert_near (test_value (s, "T1.power"), 0.985 * test_value (s, "T1.internal_power"), 1e-12);
  test_assert_near (test_value (s, "G1.power"), 0.98 * test_value (s, "T1.power"), 1e-12);
  /* Terms that do not exist have no result: no fuel, no user. */
  for (guint k = 0; k < hl_solution_n_results (s); k++)
    {
      const HlQuantityKind *kind = hl_solution_result (s, k, NULL);
      g_assert_false (g_str_has_prefix (kind->key, "fuel_"));
      g_assert_cmpstr (kind->key, !=, "heat_delivered");
      g_assert_cmpstr (kind->key, !=, "utilisation");
      g_assert_cmpstr (kind->key, !=, "net_efficiency_hhv");
    }
  g_autoptr (HlSolution) fired = solve (test_industrial_plant);
  test_assert_near (test_value (fired, "plant.fuel_heat"), test_value (fired, "B1.heat") / 0.87, 1e-12);
  test_assert_near (test_value (fired, "B1.flue_loss"), test_value (fired, "B1.fuel_heat") - test_value (fired, "B1.heat"), 1e-12);
  test_assert_near (test_value (fired, "plant.net_efficiency_hhv"), test_value (fired, "plant.net_efficiency_lhv") / 1.15, 1e-12);
  test_assert_near (test_value (fired, "plant.utilisation"),
                    (test_value (fired, "plant.net_power") + test_value (fired, "plant.heat_delivered")) / test_value (fired, "plant.fuel_heat"), 1e-12);
  test_assert_near (test_value (fired, "U1.lost_flow"), 0.3 * test_value (fired, "U1.steam.m"), 1e-12);
  test_assert_near (test_value (fired, "W1.outlet.m"), test_value (fired, "U1.lost_flow"), 1e-9);
}

static void
test_summary (void)
{
  g_autoptr (HlSolution) s = solve (test_simple_loop);
  g_autofree char *text = hl_solution_summary (s), *expected = g_strdup_printf ("Solved · 12.00 MW net · %.2f %%", 100.0 * test_value (s, "plant.net_efficiency_lhv"));
  g_assert_cmpstr (text, ==, expected);
  HlPlant *plant = test_plant (test_simple_loop);
  HlPlant *us = hl_plant_with_units (plant, HL_UNITS_US);
  hl_plant_unref (plant);
  HlAddress address;
  g_assert_true (hl_address_parse ("P1.motor_efficiency", us, &address, NULL));
  HlValue assumed = { .origin = HL_ORIGIN_ASSUMED, .value = 0.95 };
  g_autoptr (HlPlant) one = hl_plant_with_value (us, &address, &assumed, NULL);
  hl_plant_unref (us);
  g_autoptr (HlSolution) t = hl_solve (one, NULL);
  g_autofree char *other = hl_solution_summary (t);
  g_assert_true (g_str_has_suffix (other, " · 1 value assumed"));
}

/* Equation in words, then with numbers, then the inputs and where they come from. */
static void
test_explanations (void)
{
  g_autoptr (HlSolution) s = solve (test_simple_loop);
  g_autofree char *power = explain (s, "T1.power");
  g_autofree char *expected = g_strdup_printf (
    "shaft power of T1 = %.2f MW\nshaft power of T1 = internal power of T1 × mechanical efficiency of T1\n%.2f MW = %.2f MW × 0.985\n"
    "  internal power of T1 = %.2f MW  (found)\n  mechanical efficiency of T1 = 0.985  (given)\nSource: definition of an efficiency or share: one flow, power or heat over another\nSolved together with 10 other quantities of T1, G1 and P1.",
    test_value (s, "T1.power") / 1e6, test_value (s, "T1.power") / 1e6, test_value (s, "T1.internal_power") / 1e6, test_value (s, "T1.internal_power") / 1e6);
  g_assert_cmpstr (power, ==, expected);
  g_autofree char *given = explain (s, "T1.inlet.p");
  g_assert_cmpstr (given, ==, "inlet pressure of T1 = 65.00 bar\ngiven");
  g_autofree char *expansion = explain (s, "T1.exhaust.h");
  g_assert_nonnull (strstr (expansion, "enthalpy of stream 2 = enthalpy of stream 1 − isentropic efficiency of T1 × (enthalpy of stream 1 − h(exhaust pressure of T1, s(inlet pressure of T1, enthalpy of stream 1)))"));
  g_assert_nonnull (strstr (expansion, "isentropic efficiency of T1 = 0.830  (given)"));
  g_assert_nonnull (strstr (expansion, "Properties: IAPWS-IF97"));
  g_autofree char *state = explain (s, "stream:2.s");
  g_assert_nonnull (strstr (state, "entropy of stream 2 = s(exhaust pressure of T1, enthalpy of stream 2)"));
  g_autofree char *carnot = explain (s, "plant.carnot_efficiency");
  g_assert_nonnull (strstr (carnot, "1 − temperature of stream 2 ÷ steam temperature of Q1"));
  g_autofree char *efficiency = explain (s, "plant.net_efficiency_lhv");
  g_assert_nonnull (strstr (efficiency, "net power of the plant ÷ heat input of the plant"));
}

/* Every quantity that has a value has an explanation, in every plant. */
static void
test_everything_explains_itself (void)
{
  const char *const texts[] = { test_simple_loop, test_reheat_plant, test_large_plant, test_industrial_plant };
  for (guint p = 0; p < G_N_ELEMENTS (texts); p++)
    {
      g_autoptr (HlSolution) s = solve (texts[p]);
      HlPlant *plant = hl_solution_plant (s);
      for (guint c = 0; c < hl_plant_n_components (plant); c++)
        {
          const HlComponent *component = hl_plant_component (plant, c);
          for (guint k = 0; k < hl_component_n_quantities (component); k++)
            {
              HlAddress address = hl_address_component (component->id, hl_component_quantity (component, k).key);
              double value;
              g_autofree char *text = hl_solution_explain (s, &address);
              if (hl_solution_value (s, &address, &value) && text == NULL && hl_plant_value (plant, &address) == NULL)
                g_error ("%s.%s has a value and no explanation", address.id, address.key);
              g_assert_true (text == NULL || strstr (text, "{") == NULL);
            }
        }
      for (guint k = 0; k < hl_solution_n_results (s); k++)
        {
          HlAddress address = hl_address_plant (hl_solution_result (s, k, NULL)->key);
          g_autofree char *text = hl_solution_explain (s, &address);
          g_assert_nonnull (text);
        }
    }
}

static guint
count (const HlSolution *s, HlProcessKind kind, gboolean is_service)
{
  guint n = 0;
  for (guint k = 0; k < hl_solution_n_processes (s); k++)
    n += hl_solution_process (s, k)->kind == kind && hl_solution_process (s, k)->is_service == is_service;
  return n;
}

static void
test_processes (void)
{
  g_autoptr (HlSolution) s = solve (test_industrial_plant);
  g_assert_cmpuint (count (s, HL_PROCESS_EXPANSION, FALSE), ==, 3);     /* two extractions make three groups */
  g_assert_cmpuint (count (s, HL_PROCESS_COMPRESSION, FALSE), ==, 2);
  g_assert_cmpuint (count (s, HL_PROCESS_HEATING, FALSE), ==, 1);
  g_assert_cmpuint (count (s, HL_PROCESS_HEATING, TRUE), ==, 1);        /* cooling water */
  g_assert_cmpuint (count (s, HL_PROCESS_COOLING, FALSE), ==, 2);       /* condenser and user */
  g_assert_cmpuint (count (s, HL_PROCESS_MIXING, FALSE), ==, 4);        /* steam and three waters into the deaerator */
  g_assert_cmpuint (count (s, HL_PROCESS_LINE, FALSE), ==, 2);
  g_assert_cmpuint (count (s, HL_PROCESS_THROTTLING, FALSE), ==, 2);    /* valve, and the trap of the user */
  for (guint k = 0; k < hl_solution_n_processes (s); k++)
    {
      const HlProcess *process = hl_solution_process (s, k);
      if (process->kind != HL_PROCESS_EXPANSION && process->kind != HL_PROCESS_COMPRESSION)
        continue;
      g_assert_true (process->has_isentropic);
      test_assert_near (process->isentropic.s, process->from.s, 1e-9);
      test_assert_near (process->isentropic.p, process->to.p, 1e-9);
      g_assert_cmpfloat (process->to.s, >, process->from.s);
    }
}

static void
test_turbine_driven_pump (void)
{
  /* A small turbine drives the feed pump: their shaft has no generator, so its powers balance and no motor runs. */
  g_autoptr (HlSolution) s = solve (
    "heat_input Q1 steam.p=80e5 steam.T=773.15 pressure_loss=0\nsplitter X1\nturbine T1 exhaust.p=8000 isentropic_efficiency=0.85 mechanical_efficiency=1\n"
    "turbine T2 exhaust.p=8000 isentropic_efficiency=0.7 mechanical_efficiency=1\nmixer M1\ncondenser C1 cooling:1 subcooling=0\n"
    "pump P1 isentropic_efficiency=0.75 motor_efficiency=0.95\n"
    "Q1.steam > X1.inlet\nX1.outlet1 > T1.inlet\nX1.outlet2 > T2.inlet\nT1.exhaust > M1.inlet1\nT2.exhaust > M1.inlet2\nM1.outlet > C1.steam\n"
    "C1.condensate > P1.inlet\nP1.outlet > Q1.feed\nshaft T2 P1\nplant net_power=20e6 other_consumption_fraction=0\n");
  const HlFinding *meet = test_finding (s, "pressures-meet");
  g_assert_nonnull (meet);     /* both exhausts and the mixer are at one pressure: one of them is to be found */
  g_autoptr (GError) error = NULL;
  HlMend let_go = { .kind = HL_MEND_LET_GO, .address = hl_address_component ("T2", "exhaust.p") };
  g_autoptr (HlPlant) mended = hl_mend_apply (&let_go, hl_solution_plant (s), &error);
  g_autoptr (HlSolution) t = hl_solve (mended, NULL);
  test_assert_solved (t);
  test_assert_near (test_value (t, "T2.power"), test_value (t, "P1.power"), 1e-10);
  g_assert_cmpfloat (test_value (t, "P1.motor_power"), ==, 0.0);
  test_assert_near (test_value (t, "plant.net_power"), test_value (t, "T1.power"), 1e-10);
}

/* Steam known by its condensing temperature: wet at the exhaust, so the temperature gives the pressure. */
static void
test_exhaust_by_temperature (void)
{
  g_autoptr (HlPlant) plant = test_plant_set (test_plant_let_go (test_plant (test_simple_loop), "T1.exhaust.p"), "T1.exhaust.T", 313.15);
  g_autoptr (HlSolution) s = hl_solve (plant, NULL);
  HlSaturation sat;
  test_assert_solved (s);
  g_assert_cmpint (hl_fluid_saturation_T (hl_fluid_water (), 313.15, &sat), ==, HL_OK);
  test_assert_near (test_value (s, "C1.steam.p"), sat.p, 1e-9);
  /* The condensate's temperature says the same. */
  g_autoptr (HlPlant) other = test_plant_set (test_plant_let_go (test_plant (test_simple_loop), "T1.exhaust.p"), "C1.condensate.T", 313.15);
  g_autoptr (HlSolution) t = hl_solve (other, NULL);
  test_assert_solved (t);
  test_assert_near (test_value (t, "C1.steam.p"), sat.p, 1e-9);
}

#define BACK_PRESSURE "heat_input Q1 pressure_loss=0 steam.p=60e5 steam.T=750 steam.m=10\n" \
  "turbine T1 isentropic_efficiency=0.8 mechanical_efficiency=1\nboundary Y1 direction:0 outlet.T=400\nboundary Y2 direction:1\n" \
  "Y1.outlet > Q1.feed\nQ1.steam > T1.inlet\nT1.exhaust > Y2.inlet\nplant other_consumption_fraction=0\n"

/* Whether steam known by its temperature is wet shows only in the end: dry where wet was expected, and the other way round. */
static void
test_temperature_of_wet_or_dry_steam (void)
{
  g_autoptr (HlPlant) dry = test_plant_set (test_plant_set (test_plant_let_go (test_plant (test_simple_loop), "T1.exhaust.p"), "T1.exhaust.T", 420.0), "Q1.steam.T", 1000.0);
  g_autoptr (HlSolution) s = hl_solve (dry, NULL);
  test_assert_solved (s);
  test_assert_near (test_value (s, "T1.exhaust.T"), 420.0, 1e-9);
  g_assert_true (isnan (test_value (s, "T1.exhaust.x")));
  g_autoptr (HlPlant) back = test_plant_set (test_plant (BACK_PRESSURE), "T1.exhaust.T", 470.0), wet = test_plant_set (test_plant (BACK_PRESSURE), "T1.exhaust.T", 330.0);
  g_autoptr (HlSolution) t = hl_solve (back, NULL), u = hl_solve (wet, NULL);
  test_assert_solved (t);
  test_assert_solved (u);
  test_assert_near (test_value (t, "T1.exhaust.T"), 470.0, 1e-9);
  test_assert_near (test_value (u, "T1.exhaust.T"), 330.0, 1e-9);
  g_assert_cmpfloat (test_value (u, "T1.exhaust.x"), <, 1.0);
}

static void
test_what_is_known_of_an_unfinished_plant (void)
{
  g_autoptr (HlPlant) plant = test_plant_let_go (test_plant (test_simple_loop), "plant.net_power");
  g_autoptr (HlSolution) s = hl_solve (plant, NULL);
  HlStreamResult result;
  g_assert_false (hl_solution_is_solved (s));
  hl_solution_stream (s, 1, &result);
  g_assert_true (result.has_state);       /* states do not need the flow */
  g_assert_false (result.has_flow);
  test_assert_near (result.state.p, 7000.0, 1e-12);
  test_assert_near (test_value (s, "plant.carnot_efficiency"), 1.0 - result.state.T / 758.15, 1e-9);
  g_assert_true (isnan (test_value (s, "plant.gross_power")));
}

/* Something new on the sheet, not yet connected, takes nothing from what stands: its findings apart, all is as before. */
static void
test_what_is_still_being_drawn (void)
{
  static const char *const added[] = { "new pump P9\n", "new turbine T9\nshaft T1 T9 G1\n", "new closed_heater H9\n", "new heat_input Q9\n", "new condenser C9\nnew pump P9\nC9.condensate > P9.inlet\n" };
  g_autoptr (HlPlant) plant = test_plant (test_simple_loop);
  g_autoptr (HlSolution) whole = hl_solve (plant, NULL);
  g_assert_false (hl_solution_is_partial (whole));
  for (guint k = 0; k < G_N_ELEMENTS (added); k++)
    {
      g_autofree char *text = g_strconcat (test_simple_loop, added[k], NULL);
      g_autoptr (HlPlant) more = test_plant (text);
      g_autoptr (HlSolution) s = hl_solve (more, NULL);
      g_assert_false (hl_solution_is_solved (s));
      g_assert_nonnull (test_finding (s, "open-port"));
      if (!hl_solution_is_partial (s))
        test_print (s);
      g_assert_true (hl_solution_is_partial (s));
      for (guint n = 0; n < hl_plant_n_streams (plant); n++)
        {
          HlStreamResult a, b;
          hl_solution_stream (whole, n, &a);
          hl_solution_stream (s, n, &b);
          g_assert_true (b.has_flow && b.has_state);
          test_assert_near (b.m, a.m, 1e-9);
          test_assert_near (b.state.h, a.state.h, 1e-9);
        }
      test_assert_near (test_value (s, "plant.net_power"), 12e6, 1e-9);
    }
  /* A surplus value, or one that cannot be, leaves nothing to rely on. */
  g_autoptr (HlPlant) surplus = test_plant_set (test_plant (test_simple_loop), "P1.outlet.p", 70e5);
  g_autoptr (HlSolution) none = hl_solve (surplus, NULL);
  g_assert_false (hl_solution_is_partial (none));
}

int
main (int argc, char **argv)
{
  g_test_init (&argc, &argv, NULL);
  g_test_add_func ("/engine/solution/three-addresses", test_a_state_has_three_addresses);
  g_test_add_func ("/engine/solution/results-by-their-names", test_results_by_their_names);
  g_test_add_func ("/engine/solution/summary", test_summary);
  g_test_add_func ("/engine/solution/explanations", test_explanations);
  g_test_add_func ("/engine/solution/everything-explains-itself", test_everything_explains_itself);
  g_test_add_func ("/engine/solution/processes", test_processes);
  g_test_add_func ("/engine/solution/turbine-driven-pump", test_turbine_driven_pump);
  g_test_add_func ("/engine/solution/exhaust-by-temperature", test_exhaust_by_temperature);
  g_test_add_func ("/engine/solution/temperature-of-wet-or-dry-steam", test_temperature_of_wet_or_dry_steam);
  g_test_add_func ("/engine/solution/unfinished-plant", test_what_is_known_of_an_unfinished_plant);
  g_test_add_func ("/engine/solution/still-being-drawn", test_what_is_still_being_drawn);
  return g_test_run ();
}
