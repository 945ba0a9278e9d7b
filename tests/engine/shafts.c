/* Shafts with gearboxes, driven pumps and their turbines: against hand calculations, both ways, and findings.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "laws.h"
#include <math.h>

/* Two sections with a condenser; what stands on the shaft, and in which order, differs. */
#define GEARED(pump, more, shaft) \
  "heat_input Q1 pressure_loss=0 steam.T=750\nturbine T1 inlet.p=60e5 inlet.m=10 exhaust.p=8e5 isentropic_efficiency=0.78 mechanical_efficiency=0.98\n" \
  "turbine T2 exhaust.p=1e4 isentropic_efficiency=0.8 mechanical_efficiency=0.98\ngearbox GB1 efficiency=0.97\ngearbox GB2 efficiency=0.985\n" \
  "generator G1 efficiency=0.96\ncondenser C1 cooling:1 subcooling=0\npump P1 isentropic_efficiency=0.7" pump "\n" more \
  "Q1.steam > T1.inlet\nT1.exhaust > T2.inlet\nT2.exhaust > C1.steam\nC1.condensate > P1.inlet\nP1.outlet > Q1.feed\n" \
  "shaft " shaft "\nplant other_consumption_fraction=0\n"
#define WITH_MOTOR " motor_efficiency=0.95"

static HlSolution *
solved (const char *text)
{
  g_autoptr (HlPlant) plant = test_plant (text);
  HlSolution *s = hl_solve (plant, NULL);
  test_assert_solved (s);
  test_assert_balanced (s);
  return s;
}

/* Each section behind its own gearbox, on both sides of one generator. */
static void
test_gearboxes_lose_of_what_passes (void)
{
  g_autoptr (HlSolution) s = solved (GEARED (WITH_MOTOR, "", "T1 GB1 G1 GB2 T2"));
  double first = test_value (s, "T1.power"), second = test_value (s, "T2.power");
  test_assert_near (test_value (s, "GB1.input_power"), first, 1e-9);
  test_assert_near (test_value (s, "GB2.input_power"), second, 1e-9);
  test_assert_near (test_value (s, "GB1.loss"), 0.03 * first, 1e-9);
  test_assert_near (test_value (s, "GB2.loss"), 0.015 * second, 1e-9);
  test_assert_near (test_value (s, "G1.shaft_power"), 0.97 * first + 0.985 * second, 1e-9);
  test_assert_near (test_value (s, "plant.gross_power"), 0.96 * (0.97 * first + 0.985 * second), 1e-9);
}

/* The second one takes what the first has left, and what the section between them adds. */
static void
test_gearboxes_in_a_row (void)
{
  g_autoptr (HlSolution) s = solved (GEARED (WITH_MOTOR, "", "T1 GB1 T2 GB2 G1"));
  double first = test_value (s, "T1.power"), second = test_value (s, "T2.power");
  test_assert_near (test_value (s, "GB1.input_power"), first, 1e-9);
  test_assert_near (test_value (s, "GB2.input_power"), 0.97 * first + second, 1e-9);
  test_assert_near (test_value (s, "G1.shaft_power"), 0.985 * (0.97 * first + second), 1e-9);
}

/* Behind a gearbox the pump takes more from the sections than it gets; what is left goes through the other. */
static void
test_pump_behind_its_gearbox (void)
{
  g_autoptr (HlSolution) s = solved (GEARED ("", "", "P1 GB2 T2 T1 GB1 G1"));
  double pump = test_value (s, "P1.power"), turbines = test_value (s, "T1.power") + test_value (s, "T2.power");
  g_assert_cmpfloat (test_value (s, "P1.motor_power"), ==, 0.0);
  test_assert_near (test_value (s, "GB2.output_power"), pump, 1e-9);
  test_assert_near (test_value (s, "GB2.input_power"), pump / 0.985, 1e-9);
  test_assert_near (test_value (s, "GB1.input_power"), turbines - pump / 0.985, 1e-9);
  test_assert_near (test_value (s, "G1.power"), 0.96 * 0.97 * (turbines - pump / 0.985), 1e-9);
}

/* A generator on either side: the one beside the first section takes more than that gives, so power runs back. */
#define BACK GEARED (WITH_MOTOR, "generator G2 efficiency=0.96 shaft_power=8e6\n", "T1 G2 GB1 G1 GB2 T2")

static void
test_power_may_run_back (void)
{
  g_autoptr (HlSolution) s = solved (BACK);
  double lacking = 8e6 - test_value (s, "T1.power");
  g_assert_cmpfloat (lacking, >, 1e6);
  test_assert_near (test_value (s, "GB1.input_power"), -lacking, 1e-9);
  test_assert_near (test_value (s, "GB1.output_power"), -lacking / 0.97, 1e-9);
  test_assert_near (test_value (s, "GB1.loss"), lacking / 0.97 - lacking, 1e-8);
  test_assert_near (test_value (s, "G1.shaft_power"), 0.985 * test_value (s, "T2.power") - lacking / 0.97, 1e-9);
}

/* Several sections on one line without a gearbox: the order says nothing. */
static void
test_order_matters_to_gearboxes_only (void)
{
  g_autoptr (HlSolution) s = solved (GEARED ("", "", "T1 G1 GB1 T2 P1")), t = solved (GEARED ("", "", "T1 T2 P1 G1"));
  test_assert_near (test_value (t, "G1.shaft_power"), test_value (t, "T1.power") + test_value (t, "T2.power") - test_value (t, "P1.power"), 1e-10);
  test_assert_near (test_value (s, "G1.shaft_power"),
                    test_value (s, "T1.power") + 0.97 * (test_value (s, "T2.power") - test_value (s, "P1.power")), 1e-10);
  g_assert_nonnull (test_finding (t, "no-shaft"));
}

/* Steam from an extraction drives the feed pump. */
#define FEED_TURBINE(words) \
  "heat_input Q1 pressure_loss=0 steam.T=700\nturbine T1 extractions:1 inlet.p=40e5 extraction1.p=6e5 exhaust.p=1e4 isentropic_efficiency=0.8 mechanical_efficiency=0.98\n" \
  "feed_pump_turbine FT1 isentropic_efficiency=0.76 mechanical_efficiency=0.97\ncondenser C1 cooling:1 subcooling=0\nmixer M1 inlets:2\npump P1 isentropic_efficiency=0.7" words "\n" \
  "Q1.steam > T1.inlet\nT1.extraction1 > FT1.inlet\nT1.exhaust > M1.inlet1\nFT1.exhaust > M1.inlet2\nM1.outlet > C1.steam\n" \
  "C1.condensate > P1.inlet\nP1.outlet > Q1.feed\n"
#define WITH_FEED_TURBINE FEED_TURBINE ("") "shaft FT1 P1\nplant net_power=5e6 other_consumption_fraction=0\n"

static void
test_feed_pump_turbine (void)
{
  g_autoptr (HlSolution) s = solved (WITH_FEED_TURBINE);
  HlState end;
  test_assert_near (test_value (s, "FT1.power"), test_value (s, "P1.power"), 1e-10);
  g_assert_cmpint (hl_fluid_state_ps (hl_fluid_water (), 1e4, test_value (s, "FT1.inlet.s"), &end), ==, HL_OK);
  double drop = 0.76 * (test_value (s, "FT1.inlet.h") - end.h);
  test_assert_near (test_value (s, "FT1.inlet.m"), test_value (s, "P1.power") / 0.97 / drop, 1e-9);
  /* Its power is no electricity; the pump has no motor. */
  test_assert_near (test_value (s, "plant.gross_power"), test_value (s, "T1.power"), 1e-12);
  test_assert_near (test_value (s, "plant.net_power"), test_value (s, "plant.gross_power"), 1e-12);
}

static void
test_feed_pump_behind_a_gearbox (void)
{
  g_autoptr (HlSolution) s = solved (FEED_TURBINE ("") "gearbox GB1 efficiency=0.98\nshaft FT1 GB1 P1\nplant net_power=5e6 other_consumption_fraction=0\n");
  test_assert_near (test_value (s, "FT1.power"), test_value (s, "P1.power") / 0.98, 1e-10);
}

/* Fans take a part of gross power; a plant without any has none to give a part of. */
#define COOLED(words) \
  "boundary Y1 direction:0 outlet.m=2 outlet.x=1\nboundary Y2 direction:1\nair_condenser AC1 subcooling=0 air:1 ambient_T=288.15 initial_difference=25" words "\n" \
  "Y1.outlet > AC1.steam\nAC1.condensate > Y2.inlet\n"

static void
test_fans_without_gross_power (void)
{
  g_autoptr (HlSolution) s = solved (COOLED (" fan_fraction=0.015")), t = solved (COOLED (" fan_power=50e3"));
  g_assert_true (isnan (test_value (s, "AC1.fan_power")));
  g_assert_true (isnan (test_value (s, "plant.own_consumption")));
  test_assert_near (test_value (t, "AC1.fan_power"), 50e3, 1e-12);
  test_assert_near (test_value (t, "plant.own_consumption"), 50e3, 1e-12);
  g_assert_null (test_finding (t, "fans-not-counted"));
}

/* The compressor of a heat pump is own consumption though nothing gives electricity. */
static void
test_compressor_without_gross_power (void)
{
  g_autoptr (HlSolution) s = solved ("boundary Y1 direction:0 outlet.p=1e5 outlet.m=2 outlet.x=1\nboundary Y2 direction:1 inlet.p=3e5\n"
                                     "compressor K1 isentropic_efficiency=0.75 motor_efficiency=0.95\nY1.outlet > K1.inlet\nK1.outlet > Y2.inlet\n");
  test_assert_near (test_value (s, "plant.own_consumption"), test_value (s, "K1.power") / 0.95, 1e-12);
}

static void
test_derivatives (void)
{
  test_check_derivatives (GEARED (WITH_MOTOR, "", "T1 GB1 G1 GB2 T2"));
  test_check_derivatives (GEARED ("", "", "P1 GB2 T2 T1 GB1 G1"));
  test_check_derivatives (BACK);
  test_check_derivatives (WITH_FEED_TURBINE);
}

static void
test_both_ways (void)
{
  g_assert_cmpuint (test_give_each (GEARED (WITH_MOTOR, "", "T1 GB1 G1 GB2 T2")), >, 20);
  g_assert_cmpuint (test_give_each (BACK), >, 20);
  g_assert_cmpuint (test_give_each (WITH_FEED_TURBINE), >, 15);
}

static void
test_findings (void)
{
  test_expect_finding (GEARED (WITH_MOTOR, "", "T1 T2 G1 GB1"), "gearbox-at-end", HL_GRADE_WARNING,
                       "Gearbox GB1 stands at the end of its shaft: no power passes through it. Join it between the machines that it is to connect.");
  test_expect_finding (FEED_TURBINE (WITH_MOTOR " power=40e3") "plant net_power=5e6 other_consumption_fraction=0\n",
                       "no-shaft", HL_GRADE_WARNING, "Feed pump turbine FT1 drives nothing, and its power is lost. Join it to a pump.");
  test_expect_finding (COOLED (" fan_fraction=0.015"), "fans-not-counted", HL_GRADE_CAUTION,
                       "Fans of AC1 are to take a part of gross power, and this plant has none: they are not counted. Give their power itself.");
}

int
main (int argc, char **argv)
{
  g_test_init (&argc, &argv, NULL);
  g_test_add_func ("/engine/shafts/gearboxes-lose-of-what-passes", test_gearboxes_lose_of_what_passes);
  g_test_add_func ("/engine/shafts/gearboxes-in-a-row", test_gearboxes_in_a_row);
  g_test_add_func ("/engine/shafts/pump-behind-its-gearbox", test_pump_behind_its_gearbox);
  g_test_add_func ("/engine/shafts/power-may-run-back", test_power_may_run_back);
  g_test_add_func ("/engine/shafts/order-matters-to-gearboxes-only", test_order_matters_to_gearboxes_only);
  g_test_add_func ("/engine/shafts/feed-pump-turbine", test_feed_pump_turbine);
  g_test_add_func ("/engine/shafts/feed-pump-behind-a-gearbox", test_feed_pump_behind_a_gearbox);
  g_test_add_func ("/engine/shafts/fans-without-gross-power", test_fans_without_gross_power);
  g_test_add_func ("/engine/shafts/compressor-without-gross-power", test_compressor_without_gross_power);
  g_test_add_func ("/engine/shafts/derivatives", test_derivatives);
  g_test_add_func ("/engine/shafts/both-ways", test_both_ways);
  g_test_add_func ("/engine/shafts/findings", test_findings);
  return g_test_run ();
}
