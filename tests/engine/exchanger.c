/* Exchanger and recuperator against hand calculations, both ways, and what goes wrong in them.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "laws.h"
#include "engine/exchanger-curve.h"
#include <math.h>
#include <string.h>

/* Pressurised water warms and boils water at 10 bar. */
#define BOILER(words) \
  "boundary Y1 direction:0 outlet.p=100e5 outlet.T=550 outlet.m=20\nboundary Y2 direction:1\n" \
  "boundary Y3 direction:0 outlet.p=10e5 outlet.T=330\nboundary Y4 direction:1\n" \
  "exchanger E1 hot_pressure_loss=0 cold_pressure_loss=0 " words "\n" \
  "Y1.outlet > E1.hot_inlet\nE1.hot_outlet > Y2.inlet\nY3.outlet > E1.cold_inlet\nE1.cold_outlet > Y4.inlet\n"

static double
h_pT (double p, double T)
{
  HlState st;
  g_assert_cmpint (hl_fluid_state_pT (hl_fluid_water (), p, T, &st), ==, HL_OK);
  return st.h;
}

/* The pinch lies where boiling begins: from there on the hot side gives what evaporation and superheating take. */
static void
test_pinch_where_boiling_begins (void)
{
  g_autoptr (HlPlant) plant = test_plant (BOILER ("pinch=10 cold_outlet.x=1"));
  g_autoptr (HlSolution) s = hl_solve (plant, NULL);
  HlSaturation sat;
  test_assert_solved (s);
  g_assert_cmpint (hl_fluid_saturation_p (hl_fluid_water (), 10e5, &sat), ==, HL_OK);
  double m = 20.0 * (h_pT (100e5, 550.0) - h_pT (100e5, sat.T + 10.0)) / (sat.h_vapour - sat.h_liquid);
  test_assert_near (test_value (s, "E1.cold_inlet.m"), m, 1e-8);
  test_assert_near (test_value (s, "E1.heat"), m * (sat.h_vapour - h_pT (10e5, 330.0)), 1e-8);
  test_assert_near (test_value (s, "E1.cold_end_difference"), test_value (s, "E1.hot_outlet.T") - 330.0, 1e-9);
  g_assert_cmpfloat (test_value (s, "E1.cold_end_difference"), >, 10.0);
}

/* Steam condensing at one temperature against water: UA is the integral of dQ over the difference, here in a thousand parts by
 * the midpoint rule; the plain formula of the whole is close to it, for the heat capacity of water hardly changes. */
static void
test_conductance_is_the_integral (void)
{
  g_autoptr (HlPlant) plant = test_plant (
    "boundary Y1 direction:0 outlet.p=1e5 outlet.x=1 outlet.m=2\nboundary Y2 direction:1\n"
    "boundary Y3 direction:0 outlet.p=5e5 outlet.T=290\nboundary Y4 direction:1\n"
    "exchanger E1 hot_pressure_loss=0 cold_pressure_loss=0 hot_outlet.x=0 cold_outlet.T=360\n"
    "Y1.outlet > E1.hot_inlet\nE1.hot_outlet > Y2.inlet\nY3.outlet > E1.cold_inlet\nE1.cold_outlet > Y4.inlet\n");
  g_autoptr (HlSolution) s = hl_solve (plant, NULL);
  test_assert_solved (s);
  double T_hot = test_value (s, "E1.hot_inlet.T"), h0 = test_value (s, "E1.cold_inlet.h"), h1 = test_value (s, "E1.cold_outlet.h"), sum = 0.0;
  for (int k = 0; k < 1000; k++)
    {
      HlState st;
      g_assert_cmpint (hl_fluid_state_ph (hl_fluid_water (), 5e5, h0 + (k + 0.5) / 1000.0 * (h1 - h0), &st), ==, HL_OK);
      sum += 1e-3 / (T_hot - st.T);
    }
  double Q = test_value (s, "E1.heat"), plain = Q * log ((T_hot - 290.0) / (T_hot - 360.0)) / 70.0;
  test_assert_near (test_value (s, "E1.UA"), Q * sum, 1e-5);
  test_assert_near (test_value (s, "E1.UA"), plain, 2e-2);
  test_assert_near (test_value (s, "E1.pinch"), T_hot - 360.0, 1e-9);
  /* The condensate could still cool down: it is the steam side that bounds the effectiveness. */
  double h_steam = test_value (s, "E1.hot_inlet.h");
  test_assert_near (test_value (s, "E1.effectiveness"), (h_steam - test_value (s, "E1.hot_outlet.h")) / (h_steam - h_pT (1e5, 290.0)), 1e-9);
}

/* Pinch, effectiveness, UA, heat, an outlet or an end's difference: each of them says the same. */
static void
test_any_of_them_may_be_given (void)
{
  static const char *const keys[] = { "effectiveness", "UA", "heat", "hot_outlet.T", "cold_outlet.T", "hot_end_difference", "cold_end_difference" };
  g_autoptr (HlPlant) plant = test_plant (BOILER ("pinch=12 cold_inlet.m=3"));
  g_autoptr (HlSolution) s = hl_solve (plant, NULL);
  test_assert_solved (s);
  for (guint k = 0; k < G_N_ELEMENTS (keys); k++)
    {
      g_autofree char *address = g_strconcat ("E1.", keys[k], NULL);
      double value = test_value (s, address);
      if (isnan (value))
        continue;
      g_test_message ("%s = %g", address, value);
      g_autoptr (HlPlant) other = test_plant_set (test_plant (BOILER ("cold_inlet.m=3")), address, value);
      g_autoptr (HlSolution) t = hl_solve (other, NULL);
      test_assert_solved (t);
      test_assert_near (test_value (t, "E1.pinch"), 12.0, 1e-6);
      test_assert_near (test_value (t, "E1.heat"), test_value (s, "E1.heat"), 1e-8);
    }
}

#define WARMED(words) \
  "heat_input Q1 pressure_loss=0 steam.T=650\nturbine T1 inlet.p=8e5 exhaust.p=1.1e5 isentropic_efficiency=0.8 mechanical_efficiency=0.98\n" \
  "generator G1 efficiency=0.97\nrecuperator R1 hot_pressure_loss=0.02 cold_pressure_loss=0.01 " words "\n" \
  "condenser C1 cooling:1 subcooling=0\npump P1 isentropic_efficiency=0.7 motor_efficiency=0.95\n" \
  "Q1.steam > T1.inlet\nT1.exhaust > R1.hot_inlet\nR1.hot_outlet > C1.steam\nC1.condensate > P1.inlet\nP1.outlet > R1.cold_inlet\n" \
  "R1.cold_outlet > Q1.feed\nshaft T1 G1\nplant net_power=1e6 other_consumption_fraction=0\n"

static void
test_recuperator_in_a_cycle (void)
{
  g_autoptr (HlPlant) plant = test_plant (WARMED ("pinch=8"));
  g_autoptr (HlSolution) s = hl_solve (plant, NULL);
  test_assert_solved (s);
  test_assert_balanced (s);
  /* What it gives back the heater need not give. */
  test_assert_near (test_value (s, "plant.heat_input"), test_value (s, "R1.hot_inlet.m") * (test_value (s, "Q1.steam.h") - test_value (s, "P1.outlet.h"))
                    - test_value (s, "R1.heat"), 1e-9);
  g_assert_cmpfloat (test_value (s, "R1.heat"), >, 1e5);
  g_assert_cmpuint (test_give_each (WARMED ("pinch=8")), >, 20);
}

static void
test_derivatives (void)
{
  test_check_derivatives (BOILER ("pinch=12 cold_inlet.m=3"));
  test_check_derivatives (BOILER ("UA=2e5 cold_inlet.m=4 "));
  test_check_derivatives (WARMED ("pinch=8"));
}

/* From liquid through boiling to superheated: heat, pinch and UA go on without a step. */
static void
test_zones_come_and_go (void)
{
  double last = NAN, last_pinch = NAN;
  for (double T = 551.0; T > 440.0; T -= 1.5)
    {
      g_autoptr (HlPlant) plant = test_plant_set (test_plant (BOILER ("UA=1.5e5 cold_inlet.m=4")), "Y1.outlet.T", T);
      g_autoptr (HlSolution) s = hl_solve (plant, NULL);
      test_assert_solved (s);
      double heat = test_value (s, "E1.heat"), pinch = test_value (s, "E1.pinch");
      g_assert_cmpfloat (pinch, >, 0.0);
      if (!isnan (last))
        {
          g_assert_cmpfloat (heat, <, last);
          g_assert_cmpfloat (last - heat, <, 0.08 * last);
          g_assert_cmpfloat (fabs (pinch - last_pinch), <, 4.0);
        }
      last = heat;
      last_pinch = pinch;
    }
}

static void
test_findings (void)
{
  test_expect_finding (BOILER ("cold_inlet.m=8 cold_outlet.x=1"), "temperature-cross", HL_GRADE_ERROR, "In E1 the cold side would be ");
  test_expect_finding (BOILER ("cold_inlet.m=4 pinch=1.5"), "small-difference", HL_GRADE_CAUTION, "In E1 only 1.5 K remain between the two sides");
  test_expect_finding (BOILER ("cold_inlet.m=4 cold_outlet.T=320"), "heat-runs-backwards", HL_GRADE_ERROR, "In E1 heat would pass from the cold side, which comes in at 56.9 °C, to the hot side");
}

int
main (int argc, char **argv)
{
  g_test_init (&argc, &argv, NULL);
  g_test_add_func ("/engine/exchanger/pinch-where-boiling-begins", test_pinch_where_boiling_begins);
  g_test_add_func ("/engine/exchanger/conductance-is-the-integral", test_conductance_is_the_integral);
  g_test_add_func ("/engine/exchanger/any-of-them-may-be-given", test_any_of_them_may_be_given);
  g_test_add_func ("/engine/exchanger/recuperator-in-a-cycle", test_recuperator_in_a_cycle);
  g_test_add_func ("/engine/exchanger/derivatives", test_derivatives);
  g_test_add_func ("/engine/exchanger/zones-come-and-go", test_zones_come_and_go);
  g_test_add_func ("/engine/exchanger/findings", test_findings);
  return g_test_run ();
}
