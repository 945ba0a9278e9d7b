/* District heater, air-cooled condenser, cooling tower, clean conductance: against hand calculations, both ways, and findings.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "laws.h"
#include <math.h>
#include <string.h>

/* Waste-fired set with district heat and an air-cooled condenser, without its deaerator. */
#define HEAT_PLANT(heater, condenser) \
  "heat_input Q1 pressure_loss=0 steam.T=673.15 heat=48e6\n" \
  "turbine T1 extractions:1 inlet.p=40e5 isentropic_efficiency=0.8 mechanical_efficiency=0.98\ngenerator G1 efficiency=0.97\n" \
  "district_heater DH1 drain_subcooling=0 heat=22e6 return_T=328.15 flow_T=368.15 water_p=8e5 water_pressure_loss=0 " heater "\n" \
  "air_condenser AC1 subcooling=0 fan_fraction=0.015 " condenser "\n" \
  "pump P1 isentropic_efficiency=0.75 motor_efficiency=0.95\n" \
  "Q1.steam > T1.inlet\nT1.extraction1 > DH1.steam\nT1.exhaust > AC1.steam\nDH1.drain > AC1.drain\n" \
  "AC1.condensate > P1.inlet\nP1.outlet > Q1.feed\nshaft T1 G1\nplant other_consumption_fraction=0.03\n"

static double
T_sat (double p)
{
  HlSaturation sat;
  g_assert_cmpint (hl_fluid_saturation_p (hl_fluid_water (), p, &sat), ==, HL_OK);
  return sat.T;
}

static double
h_pT (double p, double T)
{
  HlState st;
  g_assert_cmpint (hl_fluid_state_pT (hl_fluid_water (), p, T, &st), ==, HL_OK);
  return st.h;
}

static void
test_district_heat_by_hand (void)
{
  g_autoptr (HlPlant) plant = test_plant (HEAT_PLANT ("terminal_difference=5", "initial_difference=30"));
  g_autoptr (HlSolution) s = hl_solve (plant, NULL);
  test_assert_solved (s);
  test_assert_balanced (s);
  test_assert_near (T_sat (test_value (s, "DH1.steam.p")), 373.15, 1e-9);
  test_assert_near (test_value (s, "DH1.water_flow"), 22e6 / (h_pT (8e5, 368.15) - h_pT (8e5, 328.15)), 1e-9);
  HlSaturation sat;
  double h = test_value (s, "DH1.steam.h");
  g_assert_cmpint (hl_fluid_saturation_p (hl_fluid_water (), test_value (s, "DH1.steam.p"), &sat), ==, HL_OK);
  test_assert_near (test_value (s, "DH1.steam.m"), 22e6 / (h - sat.h_liquid), 1e-9);
  /* Wet or saturated steam condenses at one temperature: the plain formula, up to the water's changing heat capacity (none: by energy). */
  test_assert_near (test_value (s, "DH1.UA"), 22e6 * log (45.0 / 5.0) / 40.0, 1e-2);
  test_assert_near (test_value (s, "plant.heat_delivered"), 22e6, 1e-12);
  /* The site's air is at 288.15 K; fans take their part of gross power. */
  test_assert_near (T_sat (test_value (s, "AC1.steam.p")), hl_plant_site (plant)->ambient_T + 30.0, 1e-9);
  test_assert_near (test_value (s, "AC1.fan_power"), 0.015 * test_value (s, "plant.gross_power"), 1e-9);
  test_assert_near (test_value (s, "plant.own_consumption"), test_value (s, "AC1.fan_power") + test_value (s, "P1.motor_power") + test_value (s, "plant.other_consumption"), 1e-9);
  test_assert_near (test_value (s, "plant.heat_rejected"), test_value (s, "AC1.heat"), 1e-12);
}

/* The same water in lines of its own. */
#define LINES "boundary Y1 direction:0 outlet.p=8e5\nboundary Y2 direction:1\nY1.outlet > DH1.water_inlet\nDH1.water_outlet > Y2.inlet\n"
#define HEAT_PLANT_LINES \
  "heat_input Q1 pressure_loss=0 steam.T=673.15 heat=48e6\n" \
  "turbine T1 extractions:1 inlet.p=40e5 isentropic_efficiency=0.8 mechanical_efficiency=0.98\ngenerator G1 efficiency=0.97\n" \
  "district_heater DH1 drain_subcooling=3 heat=22e6 return_T=328.15 flow_T=368.15 water_pressure_loss=0.05 terminal_difference=5\n" \
  "air_condenser AC1 air:1 ambient_T=300 subcooling=0 fan_fraction=0.015 initial_difference=25\n" \
  "pump P1 isentropic_efficiency=0.75 motor_efficiency=0.95\n" LINES \
  "Q1.steam > T1.inlet\nT1.extraction1 > DH1.steam\nT1.exhaust > AC1.steam\nDH1.drain > AC1.drain\n" \
  "AC1.condensate > P1.inlet\nP1.outlet > Q1.feed\nshaft T1 G1\nplant other_consumption_fraction=0.03\n"

static void
test_district_water_in_lines (void)
{
  g_autoptr (HlPlant) plant = test_plant (HEAT_PLANT_LINES);
  g_autoptr (HlSolution) s = hl_solve (plant, NULL);
  test_assert_solved (s);
  test_assert_balanced (s);
  test_assert_near (test_value (s, "Y1.outlet.T"), 328.15, 1e-10);
  test_assert_near (test_value (s, "Y2.inlet.p"), 0.95 * 8e5, 1e-10);
  test_assert_near (test_value (s, "DH1.water_flow"), 22e6 / (h_pT (7.6e5, 368.15) - h_pT (8e5, 328.15)), 1e-9);
  test_assert_near (T_sat (test_value (s, "AC1.steam.p")), 325.0, 1e-9);
}

/* Condenser, tower and circulating pump in a closed circuit of water. */
#define TOWER_PLANT(words) \
  "heat_input Q1 steam.T=758.15 pressure_loss=0\nturbine T1 inlet.p=65e5 isentropic_efficiency=0.83 mechanical_efficiency=0.985\n" \
  "generator G1 efficiency=0.98\ncondenser C1 subcooling=0 cooling_rise=10 terminal_difference=5 cooling_pressure_loss=0 cleanliness=0.85\n" \
  "pump P1 isentropic_efficiency=0.75 motor_efficiency=0.95\npump P2 isentropic_efficiency=0.8 motor_efficiency=0.95\n" \
  "cooling_tower CT1 water_outlet.p=1e5 lift=1e5 evaporation_fraction=0.016 drift_fraction=0.0001 cycles=5 " words "\n" \
  "Q1.steam > T1.inlet\nT1.exhaust > C1.steam\nC1.condensate > P1.inlet\nP1.outlet > Q1.feed\n" \
  "CT1.water_outlet > P2.inlet\nP2.outlet > C1.cooling_inlet\nC1.cooling_outlet > CT1.water_inlet\n" \
  "shaft T1 G1\nplant net_power=12e6 other_consumption_fraction=0\n"

static void
test_tower_by_hand (void)
{
  g_autoptr (HlPlant) plant = test_plant (TOWER_PLANT ("air:1 wet_bulb_T=291.15 approach=6"));
  g_autoptr (HlSolution) s = hl_solve (plant, NULL);
  test_assert_solved (s);
  test_assert_balanced (s);
  /* Wet bulb 18 °C, approach 6 K, rise 10 K, difference 5 K: 39 °C, plus what the circulating pump adds. */
  double warmed = test_value (s, "C1.cooling_inlet_T") - 297.15;
  g_assert_cmpfloat (warmed, >, 0.0);
  g_assert_cmpfloat (warmed, <, 0.05);
  test_assert_near (T_sat (test_value (s, "C1.steam.p")), 291.15 + 6.0 + warmed + 10.0 + 5.0, 1e-9);
  /* All the condenser's heat, and the circulating pump's power, leave through the tower. */
  test_assert_near (test_value (s, "CT1.heat"), test_value (s, "C1.heat") + test_value (s, "P2.power"), 1e-8);
  test_assert_near (test_value (s, "CT1.range"), 10.0 + warmed, 1e-6);
  double m = test_value (s, "C1.cooling_flow"), evaporation = 0.016 * m;
  test_assert_near (test_value (s, "CT1.make_up_flow"), evaporation * 5.0 / 4.0, 1e-9);
  test_assert_near (test_value (s, "CT1.blowdown"), evaporation / 4.0 - 1e-4 * m, 1e-9);
  /* Salt in with the make-up is salt out with blowdown and drift, five times as dense. */
  test_assert_near (test_value (s, "CT1.make_up_flow"), 5.0 * (test_value (s, "CT1.blowdown") + test_value (s, "CT1.drift")), 1e-9);
  test_assert_near (test_value (s, "C1.clean_UA"), test_value (s, "C1.UA") / 0.85, 1e-12);
}

static void
test_tower_takes_the_site (void)
{
  g_autoptr (HlPlant) plant = test_plant (TOWER_PLANT ("approach=5"));
  g_autoptr (HlSolution) s = hl_solve (plant, NULL);
  test_assert_solved (s);
  test_assert_near (test_value (s, "CT1.water_outlet.T"), hl_plant_site (plant)->wet_bulb_T + 5.0, 1e-10);
}

static void
test_derivatives (void)
{
  test_check_derivatives (HEAT_PLANT ("terminal_difference=5", "initial_difference=30"));
  test_check_derivatives (HEAT_PLANT_LINES);
  test_check_derivatives (TOWER_PLANT ("air:1 wet_bulb_T=291.15 approach=6"));
}

static void
test_both_ways (void)
{
  g_assert_cmpuint (test_give_each (HEAT_PLANT ("terminal_difference=5", "air:1 ambient_T=290 initial_difference=30")), >, 25);
  g_assert_cmpuint (test_give_each (HEAT_PLANT_LINES), >, 25);
  g_assert_cmpuint (test_give_each (TOWER_PLANT ("air:1 wet_bulb_T=291.15 approach=6")), >, 25);
}

static void
test_findings (void)
{
  test_expect_finding (HEAT_PLANT ("terminal_difference=-3", "initial_difference=30"), "temperature-cross", HL_GRADE_ERROR,
          "District water of DH1 would leave at 95.0 °C, but the steam condenses at 92.0 °C.");
  test_expect_finding (HEAT_PLANT ("terminal_difference=1.5", "initial_difference=30"), "small-difference", HL_GRADE_CAUTION, "Only 1.5 K remain between steam and district water of DH1");
  test_expect_finding (HEAT_PLANT ("terminal_difference=5", "initial_difference=-4"), "temperature-cross", HL_GRADE_ERROR, "Steam of AC1 would condense 4.0 K below the temperature of the air");
  test_expect_finding (HEAT_PLANT ("terminal_difference=5", "initial_difference=1.5"), "small-difference", HL_GRADE_CAUTION, "Only 1.5 K remain between steam and air of AC1; 15 to 35 K are usual.");
  test_expect_finding (TOWER_PLANT ("air:1 wet_bulb_T=291.15 approach=2"), "small-approach", HL_GRADE_CAUTION, "The approach of CT1 is 2.0 K; about 2.5 K is the least");
  test_expect_finding (TOWER_PLANT ("air:1 wet_bulb_T=291.15 approach=-1"), "below-wet-bulb", HL_GRADE_ERROR, "Water would leave CT1 at the wet bulb temperature or below it");
}

int
main (int argc, char **argv)
{
  g_test_init (&argc, &argv, NULL);
  g_test_add_func ("/engine/cooling/district-heat-by-hand", test_district_heat_by_hand);
  g_test_add_func ("/engine/cooling/district-water-in-lines", test_district_water_in_lines);
  g_test_add_func ("/engine/cooling/tower-by-hand", test_tower_by_hand);
  g_test_add_func ("/engine/cooling/tower-takes-the-site", test_tower_takes_the_site);
  g_test_add_func ("/engine/cooling/derivatives", test_derivatives);
  g_test_add_func ("/engine/cooling/both-ways", test_both_ways);
  g_test_add_func ("/engine/cooling/findings", test_findings);
  return g_test_run ();
}
