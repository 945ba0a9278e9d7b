/* Compressor, gearbox, motor, and a pump driven by its turbine: against hand calculations, both ways, and findings.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "laws.h"
#include <math.h>
#include <string.h>

/* Steam as the working fluid of a heat pump: evaporated at 1 bar, condensed against district water. */
#define HEAT_PUMP(machine) \
  "heat_input Q1 pressure_loss=0 steam.p=1e5 steam.x=1\ncompressor K1 isentropic_efficiency=0.75 " machine "\n" \
  "district_heater DH1 heat=1e6 drain_subcooling=0 terminal_difference=5 return_T=370 flow_T=400 water_p=8e5 water_pressure_loss=0\nvalve V1\n" \
  "Q1.steam > K1.inlet\nK1.outlet > DH1.steam\nDH1.drain > V1.inlet\nV1.outlet > Q1.feed\n"

static double
h_ps (double p, double s)
{
  HlState st;
  g_assert_cmpint (hl_fluid_state_ps (hl_fluid_water (), p, s, &st), ==, HL_OK);
  return st.h;
}

static void
test_heat_pump_by_hand (void)
{
  g_autoptr (HlPlant) plant = test_plant (HEAT_PUMP ("motor_efficiency=0.95"));
  g_autoptr (HlSolution) s = hl_solve (plant, NULL);
  HlSaturation cold, hot;
  test_assert_solved (s);
  test_assert_balanced (s);
  g_assert_cmpint (hl_fluid_saturation_p (hl_fluid_water (), 1e5, &cold), ==, HL_OK);
  g_assert_cmpint (hl_fluid_saturation_T (hl_fluid_water (), 405.0, &hot), ==, HL_OK);
  double work = (h_ps (hot.p, cold.s_vapour) - cold.h_vapour) / 0.75, m = 1e6 / (cold.h_vapour + work - hot.h_liquid);
  test_assert_near (test_value (s, "K1.outlet.p"), hot.p, 1e-8);
  test_assert_near (test_value (s, "K1.inlet.m"), m, 1e-7);
  test_assert_near (test_value (s, "K1.power"), m * work, 1e-7);
  test_assert_near (test_value (s, "K1.motor_power"), m * work / 0.95, 1e-7);
  test_assert_near (test_value (s, "K1.pressure_ratio"), hot.p / 1e5, 1e-8);
  /* The expansion valve keeps the enthalpy; what the source gives is what is left of the heat. */
  test_assert_near (test_value (s, "V1.outlet.h"), hot.h_liquid, 1e-8);
  test_assert_near (test_value (s, "Q1.heat"), 1e6 - m * work, 1e-7);
}

/* The same with the motor as a component of its own on the shaft. */
static void
test_motor_on_a_shaft (void)
{
  g_autoptr (HlPlant) plant = test_plant (HEAT_PUMP ("motor_efficiency=0.95") "motor EM1 efficiency=0.95\nshaft K1 EM1\n");
  g_autoptr (HlPlant) plain = test_plant (HEAT_PUMP ("motor_efficiency=0.95"));
  g_autoptr (HlSolution) s = hl_solve (plant, NULL), t = hl_solve (plain, NULL);
  test_assert_solved (s);
  test_assert_near (test_value (s, "EM1.power"), test_value (t, "K1.power"), 1e-9);
  test_assert_near (test_value (s, "EM1.motor_power"), test_value (t, "K1.motor_power"), 1e-9);
  g_assert_cmpfloat (test_value (s, "K1.motor_power"), ==, 0.0);
}

#define GEARED(words) \
  "heat_input Q1 pressure_loss=0 steam.T=700\nturbine T1 inlet.p=40e5 exhaust.p=1e4 isentropic_efficiency=0.75 mechanical_efficiency=0.98\n" \
  "generator G1 efficiency=0.96\ncondenser C1 cooling:1 subcooling=0\npump P1 isentropic_efficiency=0.7 motor_efficiency=0.95\n" words "\n" \
  "Q1.steam > T1.inlet\nT1.exhaust > C1.steam\nC1.condensate > P1.inlet\nP1.outlet > Q1.feed\nplant net_power=2e6 other_consumption_fraction=0\n"

static void
test_gearbox_takes_its_loss (void)
{
  g_autoptr (HlPlant) plant = test_plant (GEARED ("gearbox GB1 efficiency=0.97") "shaft T1 GB1 G1\n");
  g_autoptr (HlSolution) s = hl_solve (plant, NULL);
  test_assert_solved (s);
  double power = test_value (s, "T1.power");
  test_assert_near (test_value (s, "GB1.input_power"), power, 1e-10);
  test_assert_near (test_value (s, "GB1.loss"), 0.03 * power, 1e-9);
  test_assert_near (test_value (s, "G1.power"), 0.97 * 0.96 * power, 1e-9);
}

/* A part of the live steam drives the feed pump: its turbine gives just what the pump takes. */
#define FEED_TURBINE \
  "heat_input Q1 pressure_loss=0 steam.T=700\nsplitter X1 outlets:2\nturbine T1 inlet.p=40e5 exhaust.p=1e4 isentropic_efficiency=0.8 mechanical_efficiency=0.98\n" \
  "turbine T2 isentropic_efficiency=0.6 mechanical_efficiency=0.97\ncondenser C1 cooling:1 subcooling=0\nmixer M1 inlets:2\npump P1 isentropic_efficiency=0.7 motor_efficiency=0.95\n" \
  "Q1.steam > X1.inlet\nX1.outlet1 > T1.inlet\nX1.outlet2 > T2.inlet\nT1.exhaust > M1.inlet1\nT2.exhaust > M1.inlet2\nM1.outlet > C1.steam\n" \
  "C1.condensate > P1.inlet\nP1.outlet > Q1.feed\nshaft T2 P1\nplant net_power=5e6 other_consumption_fraction=0\n"

static void
test_feed_pump_turbine (void)
{
  g_autoptr (HlPlant) plant = test_plant (FEED_TURBINE);
  g_autoptr (HlSolution) s = hl_solve (plant, NULL);
  test_assert_solved (s);
  test_assert_balanced (s);
  test_assert_near (test_value (s, "T2.power"), test_value (s, "P1.power"), 1e-9);
  g_assert_cmpfloat (test_value (s, "P1.motor_power"), ==, 0.0);
  double in = test_value (s, "T2.inlet.h"), drop = 0.6 * (in - h_ps (1e4, test_value (s, "T2.inlet.s")));
  test_assert_near (test_value (s, "T2.inlet.m"), test_value (s, "P1.power") / 0.97 / drop, 1e-8);
  test_assert_near (test_value (s, "plant.gross_power"), test_value (s, "T1.power"), 1e-10);
}

static void
test_derivatives (void)
{
  test_check_derivatives (HEAT_PUMP ("motor_efficiency=0.95"));
  test_check_derivatives (GEARED ("gearbox GB1 efficiency=0.97") "shaft T1 GB1 G1\n");
  test_check_derivatives (FEED_TURBINE);
}

static void
test_both_ways (void)
{
  g_assert_cmpuint (test_give_each (HEAT_PUMP ("motor_efficiency=0.95")), >, 10);
  g_assert_cmpuint (test_give_each (HEAT_PUMP ("motor_efficiency=0.95") "motor EM1 efficiency=0.95\nshaft K1 EM1\n"), >, 10);
  g_assert_cmpuint (test_give_each (GEARED ("gearbox GB1 efficiency=0.97") "shaft T1 GB1 G1\n"), >, 15);
}

static void
test_findings (void)
{
  test_expect_finding (HEAT_PUMP ("motor_efficiency=0.95") "gearbox GB1 efficiency=0.98\n", "no-shaft", HL_GRADE_WARNING, "Gearbox GB1 is on no shaft that carries power.");
  test_expect_finding (HEAT_PUMP ("motor_efficiency=0.95") "motor EM1 efficiency=0.98\n", "no-shaft", HL_GRADE_WARNING, "Motor EM1 drives nothing.");
#define COMPRESS(words) "boundary Y1 direction:0 outlet.p=2e5 outlet.m=1 " words "\nboundary Y2 direction:1 inlet.p=4e5\n" \
  "compressor K1 isentropic_efficiency=0.75 motor_efficiency=0.95\nY1.outlet > K1.inlet\nK1.outlet > Y2.inlet\n"
  test_expect_finding (COMPRESS ("outlet.x=0.95"), "compressor-liquid", HL_GRADE_WARNING, "K1 draws vapour with 5.0 % liquid in it");
  test_expect_finding (COMPRESS ("outlet.T=350"), "compressor-liquid", HL_GRADE_ERROR, "K1 draws liquid: a compressor needs vapour.");
  test_expect_finding ("boundary Y1 direction:0 outlet.p=5e5 outlet.m=1 outlet.T=500\nboundary Y2 direction:1 inlet.p=4e5\n"
          "compressor K1 isentropic_efficiency=0.75 motor_efficiency=0.95\nY1.outlet > K1.inlet\nK1.outlet > Y2.inlet\n",
          "pressure-falls", HL_GRADE_ERROR, "K1 is to compress from 5.000 bar down to 4.000 bar.");
}

int
main (int argc, char **argv)
{
  g_test_init (&argc, &argv, NULL);
  g_test_add_func ("/engine/machines/heat-pump-by-hand", test_heat_pump_by_hand);
  g_test_add_func ("/engine/machines/motor-on-a-shaft", test_motor_on_a_shaft);
  g_test_add_func ("/engine/machines/gearbox-takes-its-loss", test_gearbox_takes_its_loss);
  g_test_add_func ("/engine/machines/feed-pump-turbine", test_feed_pump_turbine);
  g_test_add_func ("/engine/machines/derivatives", test_derivatives);
  g_test_add_func ("/engine/machines/both-ways", test_both_ways);
  g_test_add_func ("/engine/machines/findings", test_findings);
  return g_test_run ();
}
