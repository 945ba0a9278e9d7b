/* Second law: by hand, against a published example, and what it says of plants that break it.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "laws.h"
#include <math.h>
#include <string.h>

#define LOOP(source) \
  "heat_input Q1 pressure_loss=0.05 steam.T=773.15 " source "\nturbine T1 inlet.p=80e5 exhaust.p=8000 isentropic_efficiency=0.85 mechanical_efficiency=0.98\n" \
  "generator G1 efficiency=0.97\ncondenser C1 subcooling=0 cooling_inlet_T=293.15 cooling_rise=10 cooling_p=2e5\n" \
  "pump P1 isentropic_efficiency=0.75 motor_efficiency=0.95\nshaft T1 G1\n" \
  "Q1.steam > T1.inlet\nT1.exhaust > C1.steam\nC1.condensate > P1.inlet\nP1.outlet > Q1.feed\nplant net_power=10e6 other_consumption_fraction=0.02\n"

static HlSolution *
solve_at (const char *text, double dead_T)
{
  g_autoptr (HlPlant) plant = test_plant (text);
  HlSite site = *hl_plant_site (plant);
  site.dead_T = dead_T;
  site.dead_p = 1e5;
  g_autoptr (HlPlant) placed = hl_plant_with_site (plant, &site);
  HlSolution *s = hl_solve (placed, NULL);
  test_assert_solved (s);
  return s;
}

/* e = h - h0 - T0 (s - s0), from the property calls alone. */
static double
exergy (const HlState *st, double T0)
{
  HlState dead;
  g_assert_cmpint (hl_fluid_state_pT (hl_fluid_water (), 1e5, T0, &dead), ==, HL_OK);
  return st->h - dead.h - T0 * (st->s - dead.s);
}

static void
test_loop_by_hand (void)
{
  const double T0 = 288.15;
  g_autoptr (HlSolution) s = solve_at (LOOP (""), T0);
  HlStreamResult r[4];
  double e[4], m;
  test_assert_balanced (s);
  for (guint k = 0; k < 4; k++)
    {
      hl_solution_stream (s, k, &r[k]);
      e[k] = exergy (&r[k].state, T0);
      test_assert_near (r[k].e, e[k], 1e-12);
    }
  m = r[0].m;
  test_assert_near (test_value (s, "m:1") * test_value (s, "stream:2.e"), m * e[1], 1e-12);
  test_assert_near (test_value (s, "T1.exergy_fuel"), m * (e[0] - e[1]), 1e-12);
  test_assert_near (test_value (s, "T1.exergy_product"), test_value (s, "T1.power"), 1e-12);
  /* Inside the blading entropy grows; what the bearings take turns to heat at T0. */
  test_assert_near (test_value (s, "T1.exergy_destruction"),
                    m * T0 * (r[1].state.s - r[0].state.s) + 0.02 * test_value (s, "T1.internal_power"), 1e-9);
  test_assert_near (test_value (s, "T1.exergy_efficiency"), test_value (s, "T1.power") / (m * (e[0] - e[1])), 1e-12);
  test_assert_near (test_value (s, "G1.exergy_destruction"), 0.03 * test_value (s, "G1.shaft_power"), 1e-9);
  /* Cooling water from 293.15 to 303.15 K takes the heat at the logarithmic mean of both. */
  double T_water = 10.0 / log (303.15 / 293.15), heat = test_value (s, "C1.heat");
  test_assert_near (test_value (s, "C1.exergy_loss"), heat * (1.0 - T0 / T_water), 1e-9);
  test_assert_near (test_value (s, "C1.exergy_destruction"), T0 * (heat / T_water - m * (r[1].state.s - r[2].state.s)), 1e-9);
  g_assert_true (isnan (test_value (s, "C1.exergy_efficiency")));       /* it makes nothing */
  g_assert_true (isnan (test_value (s, "C1.exergy_product")));
  test_assert_near (test_value (s, "P1.exergy_fuel"), test_value (s, "P1.motor_power"), 1e-12);
  test_assert_near (test_value (s, "P1.exergy_product"), m * (e[3] - e[2]), 1e-12);
  /* Without a temperature of the source the heat is worth what the water gains. */
  test_assert_near (test_value (s, "plant.exergy_input"), m * (e[0] - e[3]), 1e-12);
  test_assert_near (test_value (s, "plant.exergy_product"), 10e6, 1e-12);
  test_assert_near (test_value (s, "plant.exergy_efficiency"), 10e6 / (m * (e[0] - e[3])), 1e-12);
  test_assert_near (test_value (s, "plant.exergy_loss"), test_value (s, "C1.exergy_loss") + test_value (s, "plant.other_consumption"), 1e-12);
}

static void
test_heat_at_the_temperature_of_its_source (void)
{
  const double T0 = 288.15;
  g_autoptr (HlSolution) plain = solve_at (LOOP (""), T0), s = solve_at (LOOP ("source_T=900"), T0);
  double heat = test_value (s, "Q1.heat");
  test_assert_balanced (s);
  test_assert_near (heat, test_value (plain, "Q1.heat"), 1e-12);
  test_assert_near (test_value (s, "Q1.exergy_fuel"), heat * (1.0 - T0 / 900.0), 1e-12);
  test_assert_near (test_value (s, "Q1.exergy_product"), test_value (plain, "plant.exergy_input"), 1e-9);
  test_assert_near (test_value (s, "Q1.exergy_destruction"), heat * (1.0 - T0 / 900.0) - test_value (plain, "plant.exergy_input"), 1e-8);
  /* A source colder than the steam that it is to make. */
  test_expect_finding (LOOP ("source_T=450"), "entropy-destroyed", HL_GRADE_ERROR, "Q1");
}

/* Surroundings colder than the dead state bring exergy in; still nothing is destroyed backwards. */
static void
test_cooling_below_the_dead_state (void)
{
  g_autoptr (HlSolution) s = solve_at (LOOP (""), 310.0);
  double cold = 0.0;
  test_assert_balanced (s);
  for (guint k = 0; k < hl_solution_n_exergy_flows (s); k++)
    if (hl_solution_exergy_flow (s, k)->kind == HL_EXERGY_COLD)
      cold += hl_solution_exergy_flow (s, k)->power;
  test_assert_near (cold, test_value (s, "C1.heat") * (310.0 * log (303.15 / 293.15) / 10.0 - 1.0), 1e-9);
  g_assert_true (isnan (test_value (s, "C1.exergy_loss")));
}

/* Chemical exergy of fuel by its ratio; an older file without one takes the usual one. */
static void
test_fuel (void)
{
  const char *text =
    "boiler B1 pressure_loss=0 steam.T=773.15 efficiency=0.9 fuel_lhv=20e6 fuel_hhv_ratio=1.05 %s\nturbine T1 inlet.p=60e5 exhaust.p=8000 isentropic_efficiency=0.85 mechanical_efficiency=1\n"
    "condenser C1 cooling:1 subcooling=0\npump P1 isentropic_efficiency=0.75 motor_efficiency=0.95\n"
    "B1.steam > T1.inlet\nT1.exhaust > C1.steam\nC1.condensate > P1.inlet\nP1.outlet > B1.feed\nplant net_power=10e6 other_consumption_fraction=0\n";
  g_autofree char *with = g_strdup_printf (text, "fuel_exergy_ratio=1.1"), *without = g_strdup_printf (text, "");
  g_autoptr (HlSolution) s = solve_at (with, 298.15), t = solve_at (without, 298.15);
  test_assert_balanced (s);
  test_assert_balanced (t);
  test_assert_near (test_value (s, "B1.exergy_fuel"), 1.1 * test_value (s, "B1.fuel_heat"), 1e-12);
  test_assert_near (test_value (t, "B1.exergy_fuel"), 1.04 * test_value (t, "B1.fuel_heat"), 1e-12);
  g_autofree char *wood = g_strdup_printf (text, "fuel:8 co2_factor=0 biogenic_co2_factor=1e-7");
  g_autoptr (HlSolution) u = solve_at (wood, 298.15);
  test_assert_near (test_value (u, "B1.exergy_fuel"), 1.2 * test_value (u, "B1.fuel_heat"), 1e-12);
  /* The heat of a condenser that nothing is known of leaves with all that the steam gave up: lost, not destroyed. */
  test_assert_near (test_value (s, "C1.exergy_loss"), test_value (s, "C1.exergy_fuel"), 1e-12);
}

/* Turbine, deaerator and users of a plant with most of its parts, each by the definition that its words state. */
static void
test_plants_close (void)
{
  const char *const texts[] = { test_simple_loop, test_reheat_plant, test_large_plant, test_industrial_plant };
  for (guint k = 0; k < G_N_ELEMENTS (texts); k++)
    {
      g_autoptr (HlSolution) s = solve_at (texts[k], 288.15);
      test_assert_balanced (s);
      test_assert_near (test_value (s, "plant.exergy_input"), test_value (s, "plant.exergy_product") + test_value (s, "plant.exergy_destruction")
                        + (isnan (test_value (s, "plant.exergy_loss")) ? 0.0 : test_value (s, "plant.exergy_loss")), 1e-9);
    }
}

/* Every kind says what counts as fuel and as product, or that it only passes on. */
static void
test_every_kind_has_a_row (void)
{
  static const char *const passing[] = { "splitter", "make_up", "boundary", "gas_source", "stack", NULL };
  for (guint k = 0; k < hl_kind_count (); k++)
    {
      const HlExergyKind *row = hl_exergy_kind (hl_kind_nth (k));
      if (row == NULL)
        g_error ("%s has no row in engine/exergy-kinds.c: say what is its fuel and its product", hl_kind_nth (k)->id);
      g_assert_true ((row->words == NULL) == g_strv_contains (passing, hl_kind_nth (k)->id));
    }
}

/* Results of the second law are read, not put in. */
static void
test_cannot_be_put_in (void)
{
  g_autoptr (HlPlant) plant = test_plant (LOOP (""));
  static const char *const keys[] = { "T1.exergy_efficiency", "plant.exergy_efficiency", "stream:2.e", "T1.inlet.e", "plant.carnot_efficiency" };
  for (guint k = 0; k < G_N_ELEMENTS (keys); k++)
    {
      HlAddress address;
      HlValue value = { .origin = HL_ORIGIN_GIVEN, .value = 0.5 };
      g_autoptr (GError) error = NULL;
      g_assert_true (hl_address_parse (keys[k], plant, &address, NULL));
      g_assert_null (hl_plant_with_value (plant, &address, &value, &error));
      g_assert_nonnull (strstr (error->message, "cannot be put in"));
    }
}

/* Without a dead state of the medium, nothing is claimed. */
static void
test_no_dead_state (void)
{
  g_autoptr (HlSolution) s = solve_at (LOOP (""), 250.0);       /* ice, which the formulation does not know */
  HlExergyBalance b;
  HlStreamResult r;
  hl_solution_stream (s, 0, &r);
  g_assert_true (isnan (r.e));
  g_assert_false (hl_solution_exergy (s, 1, &b));
  g_assert_cmpuint (hl_solution_n_exergy_flows (s), ==, 0);
  g_assert_true (isnan (test_value (s, "plant.exergy_efficiency")));
}

int
main (int argc, char **argv)
{
  g_test_init (&argc, &argv, NULL);
  g_test_add_func ("/engine/exergy/loop-by-hand", test_loop_by_hand);
  g_test_add_func ("/engine/exergy/source", test_heat_at_the_temperature_of_its_source);
  g_test_add_func ("/engine/exergy/cold", test_cooling_below_the_dead_state);
  g_test_add_func ("/engine/exergy/fuel", test_fuel);
  g_test_add_func ("/engine/exergy/plants-close", test_plants_close);
  g_test_add_func ("/engine/exergy/kinds", test_every_kind_has_a_row);
  g_test_add_func ("/engine/exergy/read-only", test_cannot_be_put_in);
  g_test_add_func ("/engine/exergy/no-dead-state", test_no_dead_state);
  return g_test_run ();
}
