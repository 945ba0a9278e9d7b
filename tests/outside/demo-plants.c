/* The demo plants: solved without errors, and the wood-fired one against a balance made by hand with IAPWS-IF97.
 * The figures of that balance are rounded ("about"): gross 13.2 MW, fuel 49.9 MW and 19.8 t/h, feedwater 183 °C, condenser
 * 19.5 MW, exhaust quality 0.885, process heat 10.2 MW where the lost water is counted down to 15 °C.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "plants.h"
#include "plant/circuit.h"
#include <math.h>

static HlSolution *
solve_demo (const char *name)
{
  g_autofree char *path = g_test_build_filename (G_TEST_DIST, "..", "data", "examples", name, NULL);
  g_autoptr (GError) error = NULL;
  g_autoptr (HlPlant) plant = hl_plant_load (path, &error);
  g_assert_no_error (error);
  HlSolution *s = hl_solve (plant, NULL);
  double mass, energy;
  test_assert_solved (s);
  hl_solution_balances (s, &mass, &energy);
  g_assert_cmpfloat (fabs (mass), <, 1e-9);
  g_assert_cmpfloat (fabs (energy), <, 1e-9);
  /* Nothing has to yield: they are stored settled. */
  GArray *yielded;
  g_autoptr (HlPlant) settled = hl_settle (plant, NULL, &yielded);
  g_assert_true (settled == plant);
  g_array_unref (yielded);
  g_assert_cmpuint (hl_plant_n_assumed (plant), >, 0);
  return s;
}

static void
test_simple_loop_demo (void)
{
  g_autoptr (HlSolution) s = solve_demo ("ferry-lane.heatloom");
  test_assert_near (test_value (s, "plant.net_power"), 12e6, 1e-12);
}

static void
test_reheat_demo (void)
{
  g_autoptr (HlSolution) s = solve_demo ("linden-row.heatloom");
  test_assert_near (test_value (s, "plant.net_power"), 60e6, 1e-12);
  g_assert_null (test_finding (s, "exhaust-moisture"));
}

static void
test_industrial_demo (void)
{
  g_autoptr (HlSolution) s = solve_demo ("tallow-fen.heatloom");
  test_assert_near (test_value (s, "plant.gross_power"), 13.2e6, 0.01);
  test_assert_near (test_value (s, "plant.fuel_heat"), 49.9e6, 0.005);
  test_assert_near (test_value (s, "plant.fuel_flow") * 3.6, 19.8, 0.005);
  test_assert_near (test_value (s, "H1.feed_outlet.T") - 273.15, 183.0, 0.003);
  test_assert_near (test_value (s, "plant.heat_rejected"), 19.5e6, 0.01);
  test_assert_near (test_value (s, "T1.exhaust.x"), 0.885, 0.001);
  HlState cold;
  g_assert_cmpint (hl_fluid_state_pT (hl_fluid_water (), 2.5e5, 288.15, &cold), ==, HL_OK);
  double lost = test_value (s, "U1.lost_flow") * (test_value (s, "U1.condensate.h") - cold.h);
  test_assert_near (test_value (s, "U1.heat") + lost, 10.2e6, 0.005);
  const HlFinding *moisture = test_finding (s, "exhaust-moisture");
  g_assert_nonnull (moisture);
  g_assert_cmpint (moisture->grade, ==, HL_GRADE_CAUTION);
}

/* Balance by hand with IAPWS-IF97, rounded: steam 64.8 t/h, gross 11.5 MW, feed pump 0.16 MW, air condenser 13.7 MW, waste 20.2 t/h, district
 * water 131 kg/s, exhaust quality 0.901; utilisation 0.587 of gross power and heat, as motors and fans were not taken off. */
static void
test_waste_demo (void)
{
  g_autoptr (HlSolution) s = solve_demo ("marrow-quay.heatloom");
  test_assert_near (test_value (s, "B1.steam.m") * 3.6, 64.8, 0.003);
  test_assert_near (test_value (s, "plant.gross_power"), 11.5e6, 0.005);
  test_assert_near (test_value (s, "P2.motor_power"), 0.16e6, 0.04);
  test_assert_near (test_value (s, "AC1.heat"), 13.7e6, 0.005);
  test_assert_near (test_value (s, "plant.fuel_flow") * 3.6, 20.2, 0.003);
  test_assert_near (test_value (s, "DH1.water_flow"), 131.0, 0.004);
  test_assert_near (test_value (s, "T1.exhaust.x"), 0.901, 0.0006);
  test_assert_near ((test_value (s, "plant.gross_power") + 22e6) / test_value (s, "plant.fuel_heat"), 0.587, 0.002);
  test_assert_near (test_value (s, "AC1.steam.p") / 1e5, 0.12, 1e-12);
  test_assert_near (test_value (s, "AC1.condensate.T") - 273.15, 49.4, 0.001);
  test_assert_near (test_value (s, "D1.outlet.T") - 273.15, 130.0, 0.001);
  /* What the blowdown takes away the make-up brings back. */
  test_assert_near (test_value (s, "W1.outlet.m"), 0.015 * test_value (s, "B1.feed.m"), 1e-9);
}

/* In summer the town takes 5 MW, and the air-cooled condenser stands at 0.20 bar. */
static void
test_waste_demo_in_summer (void)
{
  g_autoptr (HlSolution) winter = solve_demo ("marrow-quay.heatloom");
  HlPlant *plant = hl_plant_ref (hl_solution_plant (winter));
  plant = test_plant_set (test_plant_set (plant, "DH1.heat", 5e6), "AC1.steam.p", 0.20e5);
  g_autoptr (HlSolution) s = hl_solve (plant, winter);
  hl_plant_unref (plant);
  test_assert_solved (s);
  /* More steam goes all the way: more power, though from a worse vacuum. */
  g_assert_cmpfloat (test_value (s, "plant.gross_power"), >, test_value (winter, "plant.gross_power"));
  g_assert_cmpfloat (test_value (s, "plant.utilisation"), <, test_value (winter, "plant.utilisation"));
}

/* Balance by hand with IAPWS-IF97, rounded: live steam 247 kg/s, feed water 250.8 °C, heat 677 MW, gross turbine heat rate 8125 kJ/kWh (44.3 %), gross
 * plant 39.9 %, feed pump 6.5 MW, exhaust moisture 9.1 %, condenser 372 MW; saturation in the heaters 250.8, 211.6, (175.9), 144.8, 118.1, 92.4, 64.9 °C. */
static void
test_large_demo (void)
{
  static const struct { const char *heater; double T; } saturation[] = {
    { "H7.saturation_T", 250.8 }, { "H6.saturation_T", 211.6 }, { "D1.outlet.T", 175.9 }, { "H4.saturation_T", 144.8 },
    { "H3.saturation_T", 118.1 }, { "H2.saturation_T", 92.4 }, { "H1.saturation_T", 64.9 } };
  g_autoptr (HlSolution) s = solve_demo ("vesper-point.heatloom");
  test_assert_near (test_value (s, "T1.inlet.m"), 247.0, 0.002);
  test_assert_near (test_value (s, "B1.feed.T") - 273.15, 250.8, 0.0005);
  test_assert_near (test_value (s, "plant.heat_input"), 677e6, 0.001);
  test_assert_near (test_value (s, "plant.heat_rate") * 3600.0, 8125.0, 0.0003);
  test_assert_near (1.0 / test_value (s, "plant.heat_rate"), 0.443, 0.001);
  test_assert_near (test_value (s, "plant.gross_efficiency"), 0.399, 0.001);
  test_assert_near (test_value (s, "P2.power"), 6.5e6, 0.008);
  test_assert_near (test_value (s, "FT1.power"), test_value (s, "P2.power"), 1e-10);
  test_assert_near (test_value (s, "T3.exhaust_moisture"), 0.091, 0.005);
  test_assert_near (test_value (s, "C1.heat"), 372e6, 0.0015);
  test_assert_near (test_value (s, "C1.steam.p") / 1e5, 0.055, 0.005);
  for (guint k = 0; k < G_N_ELEMENTS (saturation); k++)
    g_assert_cmpfloat_with_epsilon (test_value (s, saturation[k].heater) - 273.15, saturation[k].T, 0.06);
  /* The deaerator stands high enough for the feed pump. */
  g_assert_cmpfloat_with_epsilon (test_value (s, "P2.npsh_available"), 24.0 - 0.5 - 1.5, 0.05);
  g_assert_null (test_finding (s, "npsh"));
}

/* River water of 12 °C, rise 9 and terminal difference 5 K: 0.0336 bar, gross 13.75 MW, but exhaust quality 0.866: the "better" vacuum. */
static void
test_industrial_demo_by_the_river (void)
{
  g_autoptr (HlSolution) tower = solve_demo ("tallow-fen.heatloom");
  HlPlant *plant = hl_plant_ref (hl_solution_plant (tower));
  plant = test_plant_set (plant, "T1.exhaust.p", 3360.0);
  g_autoptr (HlSolution) s = hl_solve (plant, tower);
  hl_plant_unref (plant);
  test_assert_near (test_value (s, "plant.gross_power"), 13.75e6, 0.006);
  test_assert_near (test_value (s, "T1.exhaust.x"), 0.866, 0.001);
  HlSaturation sat;
  g_assert_cmpint (hl_fluid_saturation_T (hl_fluid_water (), 273.15 + 12.0 + 9.0 + 5.0, &sat), ==, HL_OK);
  test_assert_near (sat.p, 3360.0, 0.002);
  const HlFinding *moisture = test_finding (s, "exhaust-moisture");
  g_assert_nonnull (moisture);
  g_assert_cmpint (moisture->grade, ==, HL_GRADE_WARNING);
}

/* The figures below were balanced beforehand with the same equations of state and rounded ("about"): they are checks of the whole. */

static void
test_geothermal_demo (void)
{
  g_autoptr (HlSolution) s = solve_demo ("kestrel-hollow.heatloom");
  test_assert_near (test_value (s, "TX1.inlet.m"), 66.6, 0.005);
  test_assert_near (test_value (s, "plant.heat_input"), 26.2e6, 0.005);
  test_assert_near (test_value (s, "EV1.hot_outlet.T") - 273.15, 76.0, 0.01);
  test_assert_near (test_value (s, "plant.gross_power"), 2.91e6, 0.005);
  test_assert_near (test_value (s, "P1.motor_power"), 71e3, 0.01);
  test_assert_near (test_value (s, "plant.heat_rejected"), 23.3e6, 0.005);
  test_assert_near (test_value (s, "TX1.inlet.p"), 5.53e5, 0.001);
  test_assert_near (test_value (s, "AC1.steam.p"), 1.25e5, 0.002);
}

/* Difference between gas and medium where boiling begins. */
static double
bubble_difference (const HlSolution *s, const char *gas, const char *medium)
{
  HlSaturation sat;
  HlState st;
  double p = test_value (s, "EV1.cold_outlet.p"), m = test_value (s, "TX1.inlet.m");
  g_assert_cmpint (hl_fluid_saturation_p (hl_fluid_lookup (medium), p, &sat), ==, HL_OK);
  double h = test_value (s, "EV1.hot_inlet.h") - m * (test_value (s, "TX1.inlet.h") - sat.h_liquid) / test_value (s, "Y1.outlet.m");
  g_assert_cmpint (hl_fluid_state_ph (hl_fluid_lookup (gas), test_value (s, "Y1.outlet.p"), h, &st), ==, HL_OK);
  return st.T - sat.T;
}

static void
test_waste_heat_demo (void)
{
  g_autoptr (HlSolution) s = solve_demo ("orrery-glass.heatloom");
  test_assert_near (test_value (s, "plant.heat_input"), 2.45e6, 0.005);
  test_assert_near (test_value (s, "TX1.inlet.m"), 4.57, 0.005);
  test_assert_near (test_value (s, "plant.gross_power"), 0.584e6, 0.005);
  test_assert_near (test_value (s, "P1.motor_power"), 13e3, 0.02);
  test_assert_near (test_value (s, "plant.heat_delivered"), 1.86e6, 0.005);
  test_assert_near (test_value (s, "TX1.inlet.p"), 14.4e5, 0.002);
  test_assert_near (test_value (s, "DH1.steam.p"), 0.185e5, 0.003);
  const char *gas = hl_plant_find_stream (hl_solution_plant (s), "7")->medium;
  /* That balance took a constant heat capacity for the gas; a real one falls with temperature, by two kelvin here. */
  test_assert_near (bubble_difference (s, gas, "toluene"), 55.0, 0.045);
  /* What if: 255 °C; and siloxane MM at 215 °C in the place of toluene. */
  g_autoptr (HlPlant) hotter = test_plant_set (hl_plant_ref (hl_solution_plant (s)), "EV1.evaporation_T", 528.15);
  g_autoptr (HlSolution) hot = hl_solve (hotter, s);
  test_assert_near (test_value (hot, "plant.gross_power"), 0.612e6, 0.005);
  g_autoptr (HlPlant) siloxane = hl_plant_with_medium (hl_solution_plant (s), "1", "mm", NULL);
  siloxane = test_plant_set (g_steal_pointer (&siloxane), "EV1.evaporation_T", 488.15);
  g_autoptr (HlSolution) mm = hl_solve (siloxane, NULL);
  test_assert_near (test_value (mm, "TX1.inlet.p"), 11.9e5, 0.005);
  test_assert_near (test_value (mm, "TX1.inlet.m"), 8.4, 0.005);
  test_assert_near (test_value (mm, "plant.gross_power"), 0.524e6, 0.005);
}

/* A cycle above the critical pressure on its hot side; no figures from outside, but laws: no heat is lost between the doors. */
static void
test_carbon_dioxide_demo (void)
{
  g_autoptr (HlSolution) s = solve_demo ("sallow-weir.heatloom");
  HlFluidLimits limits;
  hl_fluid_limits (hl_fluid_lookup ("carbon-dioxide"), &limits);
  g_assert_cmpfloat (test_value (s, "TX1.inlet.p"), >, 2.0 * limits.p_critical);
  g_assert_cmpfloat (test_value (s, "P1.inlet.p"), <, limits.p_critical);
  test_assert_near (test_value (s, "plant.heat_input") + test_value (s, "P1.power") - test_value (s, "TX1.internal_power"), test_value (s, "plant.heat_rejected"), 1e-9);
  test_assert_near (test_value (s, "R1.pinch"), 8.0, 1e-8);
  g_assert_cmpfloat (test_value (s, "E1.pinch"), >, 5.0);
}

static void
test_heat_pump_demo (void)
{
  g_autoptr (HlSolution) s = solve_demo ("alder-reach.heatloom");
  test_assert_near (test_value (s, "plant.heat_delivered"), 2e6, 1e-12);
  test_assert_near (test_value (s, "plant.cop") * test_value (s, "plant.power_input"), 2e6, 1e-9);
  /* Below Carnot between where it boils and where it condenses, above half of it. */
  HlSaturation hot;
  g_assert_cmpint (hl_fluid_saturation_p (hl_fluid_lookup ("ammonia"), test_value (s, "DH1.steam.p"), &hot), ==, HL_OK);
  double carnot = hot.T / (hot.T - test_value (s, "EV1.evaporation_T"));
  g_assert_cmpfloat (test_value (s, "plant.cop"), <, carnot);
  g_assert_cmpfloat (test_value (s, "plant.cop"), >, 0.5 * carnot);
}

/* Two pressure levels on the exhaust of a gas turbine: figures by the table of usual practice, no finding worse than a hint. */
static void
test_heat_recovery_demo (void)
{
  g_autoptr (HlSolution) s = solve_demo ("cinder-reach.heatloom");
  double stack = test_value (s, "ST1.inlet.T") - 273.15, steam = test_value (s, "SH1.outlet.T") - 273.15, gross = test_value (s, "plant.gross_power");
  g_assert_cmpfloat (stack, >, 90.0);
  g_assert_cmpfloat (stack, <, 130.0);
  g_assert_cmpfloat (fabs (steam - 510.0), <, 0.1);
  test_assert_near (test_value (s, "ED1.pinch"), 10.0, 1e-9);
  test_assert_near (test_value (s, "ED2.pinch"), 10.0, 1e-9);
  test_assert_near (test_value (s, "EC1.approach"), 8.0, 1e-9);
  g_assert_cmpfloat (test_value (s, "ED1.steam.m"), >, 3.0 * test_value (s, "ED2.steam.m"));
  /* Of the heat in the gas a third becomes power at best. */
  g_assert_cmpfloat (gross / test_value (s, "HG1.heat"), >, 0.24);
  g_assert_cmpfloat (gross / test_value (s, "HG1.heat"), <, 0.33);
  for (guint k = 0; k < hl_solution_n_findings (s); k++)
    g_assert_cmpint (hl_solution_finding (s, k)->grade, <=, HL_GRADE_HINT);
}

int
main (int argc, char **argv)
{
  g_test_init (&argc, &argv, NULL);
  g_test_add_func ("/outside/demo-plants/simple-loop", test_simple_loop_demo);
  g_test_add_func ("/outside/demo-plants/reheat", test_reheat_demo);
  g_test_add_func ("/outside/demo-plants/industrial", test_industrial_demo);
  g_test_add_func ("/outside/demo-plants/industrial-by-the-river", test_industrial_demo_by_the_river);
  g_test_add_func ("/outside/demo-plants/waste", test_waste_demo);
  g_test_add_func ("/outside/demo-plants/waste-in-summer", test_waste_demo_in_summer);
  g_test_add_func ("/outside/demo-plants/large", test_large_demo);
  g_test_add_func ("/outside/demo-plants/geothermal", test_geothermal_demo);
  g_test_add_func ("/outside/demo-plants/waste-heat", test_waste_heat_demo);
  g_test_add_func ("/outside/demo-plants/carbon-dioxide", test_carbon_dioxide_demo);
  g_test_add_func ("/outside/demo-plants/heat-pump", test_heat_pump_demo);
  g_test_add_func ("/outside/demo-plants/heat-recovery", test_heat_recovery_demo);
  return g_test_run ();
}
