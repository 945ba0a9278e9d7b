/* The demo plants: solved without errors, and the wood-fired one against a balance made by hand with IAPWS-IF97.
 * The figures of that balance are rounded ("about"): gross 13.2 MW, fuel 49.9 MW and 19.8 t/h, feedwater 183 °C, condenser
 * 19.5 MW, exhaust quality 0.885, process heat 10.2 MW where the lost water is counted down to 15 °C.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "plants.h"
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

int
main (int argc, char **argv)
{
  g_test_init (&argc, &argv, NULL);
  g_test_add_func ("/outside/demo-plants/simple-loop", test_simple_loop_demo);
  g_test_add_func ("/outside/demo-plants/reheat", test_reheat_demo);
  g_test_add_func ("/outside/demo-plants/industrial", test_industrial_demo);
  return g_test_run ();
}
