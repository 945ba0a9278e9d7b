/* Reverse cycles and their kinds: evaporator, expansion valve, expander; what a heat pump does for its power.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "laws.h"
#include <math.h>
#include <string.h>

/* Ammonia, boiled by water of 12 °C, condensed against heating water. */
#define HEAT_PUMP \
  "evaporator EV1 superheat=5 pinch=4 hot_pressure_loss=0.1 cold_pressure_loss=0.02\ncompressor K1 isentropic_efficiency=0.75 motor_efficiency=0.95\n" \
  "district_heater DH1 heat=1e6 drain_subcooling=3 terminal_difference=5 return_T=308.15 flow_T=323.15 water_p=6e5 water_pressure_loss=0.1\nexpansion_valve XV1\n" \
  "boundary Y1 direction:0 outlet.p=3e5 outlet.T=285.15\nboundary Y2 direction:1 inlet.T=280.15\n" \
  "EV1.cold_outlet > K1.inlet\nK1.outlet > DH1.steam\nDH1.drain > XV1.inlet\nXV1.outlet > EV1.cold_inlet\nY1.outlet > EV1.hot_inlet\nEV1.hot_outlet > Y2.inlet\n" \
  "medium 1 ammonia\n"

/* The same with heat of no drawn source. */
#define ALONE \
  "evaporator EV1 source:1 superheat=5 evaporation_T=275.15 cold_pressure_loss=0.02\ncompressor K1 isentropic_efficiency=0.75 motor_efficiency=0.95\n" \
  "condenser C1 cooling:1 subcooling=3 heat=1e6 steam.p=15e5\nexpansion_valve XV1\n" \
  "EV1.cold_outlet > K1.inlet\nK1.outlet > C1.steam\nC1.condensate > XV1.inlet\nXV1.outlet > EV1.cold_inlet\nmedium 1 ammonia\n"

static void
test_heat_pump_by_hand (void)
{
  g_autoptr (HlPlant) plant = test_plant (HEAT_PUMP);
  g_autoptr (HlSolution) s = hl_solve (plant, NULL);
  const HlFluid *fluid = hl_fluid_lookup ("ammonia");
  HlSaturation cold, hot;
  HlState in, liquid, ideal;
  test_assert_solved (s);
  test_assert_balanced (s);
  test_assert_near (test_value (s, "EV1.pinch"), 4.0, 1e-8);
  g_assert_cmpint (hl_fluid_saturation_T (fluid, 328.15, &hot), ==, HL_OK);
  g_assert_cmpint (hl_fluid_saturation_p (fluid, test_value (s, "EV1.cold_outlet.p"), &cold), ==, HL_OK);
  test_assert_near (test_value (s, "EV1.evaporation_T"), cold.T, 1e-9);
  /* The water leaves at 7 °C; evaporation lies the pinch below, a little of the boiling pressure being lost on the way. */
  g_assert_cmpfloat (cold.T, <, 280.15 - 4.0 + 0.01);
  g_assert_cmpfloat (cold.T, >, 280.15 - 4.0 - 1.0);
  g_assert_cmpint (hl_fluid_state_pT (fluid, cold.p, cold.T + 5.0, &in), ==, HL_OK);
  g_assert_cmpint (hl_fluid_state_pT (fluid, hot.p, 325.15, &liquid), ==, HL_OK);
  g_assert_cmpint (hl_fluid_state_ps (fluid, hot.p, in.s, &ideal), ==, HL_OK);
  double work = (ideal.h - in.h) / 0.75, m = 1e6 / (in.h + work - liquid.h);
  test_assert_near (test_value (s, "K1.inlet.m"), m, 1e-7);
  test_assert_near (test_value (s, "K1.power"), m * work, 1e-7);
  test_assert_near (test_value (s, "plant.power_input"), m * work / 0.95, 1e-7);
  test_assert_near (test_value (s, "plant.cop"), 1e6 / (m * work / 0.95), 1e-7);
  test_assert_near (test_value (s, "plant.cop_cooling"), (1e6 - m * work) / (m * work / 0.95), 1e-7);
  test_assert_near (test_value (s, "EV1.heat"), 1e6 - m * work, 1e-7);
  g_assert_cmpint (hl_fluid_saturation_p (fluid, test_value (s, "XV1.outlet.p"), &cold), ==, HL_OK);
  test_assert_near (test_value (s, "XV1.flash_fraction"), (liquid.h - cold.h_liquid) / (cold.h_vapour - cold.h_liquid), 1e-6);
}

static void
test_evaporator_without_source (void)
{
  g_autoptr (HlPlant) plant = test_plant (ALONE);
  g_autoptr (HlSolution) s = hl_solve (plant, NULL);
  HlSaturation cold;
  HlState in;
  test_assert_solved (s);
  test_assert_balanced (s);
  g_assert_cmpint (hl_fluid_saturation_T (hl_fluid_lookup ("ammonia"), 275.15, &cold), ==, HL_OK);
  g_assert_cmpint (hl_fluid_state_pT (hl_fluid_lookup ("ammonia"), cold.p, 280.15, &in), ==, HL_OK);
  test_assert_near (test_value (s, "K1.inlet.h"), in.h, 1e-9);
  test_assert_near (test_value (s, "EV1.heat") + test_value (s, "K1.power"), 1e6, 1e-9);
  /* Nothing is delivered here, so there is a coefficient of performance for cooling only. */
  test_assert_near (test_value (s, "plant.cop_cooling"), test_value (s, "EV1.heat") / test_value (s, "K1.motor_power"), 1e-9);
  g_assert_true (isnan (test_value (s, "plant.cop")));
  g_assert_true (isnan (test_value (s, "plant.net_power")));
}

#define ORGANIC \
  "evaporator EV1 superheat=2 pinch=6 hot_pressure_loss=0 cold_pressure_loss=0\nexpander TX1 inlet.p=%s isentropic_efficiency=0.82 mechanical_efficiency=0.985\n" \
  "generator G1 efficiency=0.97\ncondenser C1 subcooling=0 cooling_inlet_T=288.15 cooling_rise=8 cooling_p=2e5 terminal_difference=5\n" \
  "pump P1 isentropic_efficiency=0.65 motor_efficiency=0.95\nboundary Y1 direction:0 outlet.p=10e5 outlet.T=418.15 outlet.m=50\nboundary Y2 direction:1\n" \
  "EV1.cold_outlet > TX1.inlet\nTX1.exhaust > C1.steam\nC1.condensate > P1.inlet\nP1.outlet > EV1.cold_inlet\nY1.outlet > EV1.hot_inlet\nEV1.hot_outlet > Y2.inlet\n" \
  "medium 1 isopentane\nshaft TX1 G1\nplant other_consumption_fraction=0\n"

static void
test_expander_in_an_organic_cycle (void)
{
  g_autofree char *text = g_strdup_printf (ORGANIC, "6e5");
  g_autoptr (HlPlant) plant = test_plant (text);
  g_autoptr (HlSolution) s = hl_solve (plant, NULL);
  const HlFluid *fluid = hl_fluid_lookup ("isopentane");
  HlSaturation hot, cold;
  HlState in, ideal, out;
  test_assert_solved (s);
  test_assert_balanced (s);
  g_assert_cmpint (hl_fluid_saturation_p (fluid, 6e5, &hot), ==, HL_OK);
  g_assert_cmpint (hl_fluid_saturation_T (fluid, 301.15, &cold), ==, HL_OK);
  g_assert_cmpint (hl_fluid_state_pT (fluid, 6e5, hot.T + 2.0, &in), ==, HL_OK);
  g_assert_cmpint (hl_fluid_state_ps (fluid, cold.p, in.s, &ideal), ==, HL_OK);
  double drop = 0.82 * (in.h - ideal.h), m = test_value (s, "TX1.inlet.m");
  g_assert_cmpint (hl_fluid_state_ph (fluid, cold.p, in.h - drop, &out), ==, HL_OK);
  test_assert_near (test_value (s, "TX1.internal_power"), m * drop, 1e-8);
  test_assert_near (test_value (s, "TX1.power"), 0.985 * m * drop, 1e-8);
  test_assert_near (test_value (s, "TX1.volume_ratio"), out.v / in.v, 1e-8);
  g_assert_cmpfloat (test_value (s, "TX1.exhaust_moisture"), ==, 0.0);
  test_assert_near (test_value (s, "plant.gross_power"), 0.97 * 0.985 * m * drop, 1e-8);
  /* Heat of the brine counts as heat input; the pinch lies where boiling begins. */
  test_assert_near (test_value (s, "plant.heat_input"), test_value (s, "EV1.heat"), 1e-12);
  HlState brine;
  double brine_at_bubble = test_value (s, "EV1.hot_inlet.h") - m * (in.h - hot.h_liquid) / 50.0;
  g_assert_cmpint (hl_fluid_state_ph (hl_fluid_water (), 10e5, brine_at_bubble, &brine), ==, HL_OK);
  test_assert_near (brine.T - hot.T, 6.0, 1e-6);
}

static void
test_derivatives (void)
{
  g_autofree char *organic = g_strdup_printf (ORGANIC, "6e5");
  test_check_derivatives (HEAT_PUMP);
  test_check_derivatives (ALONE);
  test_check_derivatives (organic);
}

/* Every found quantity given in turn wants the same plant back. */
static void
test_both_ways (void)
{
  g_autofree char *organic = g_strdup_printf (ORGANIC, "6e5");
  g_assert_cmpuint (test_give_each (ALONE), >, 10);
  g_assert_cmpuint (test_give_each (HEAT_PUMP), >, 15);
  g_assert_cmpuint (test_give_each (organic), >, 15);
}

/* A medium that leaves wet has no superheat, and that is not an obstacle. */
static void
test_wet_outlet (void)
{
  g_autoptr (HlPlant) plant = test_plant ("evaporator EV1 source:1 heat=1e5 cold_pressure_loss=0\nboundary Y1 direction:0 outlet.p=3e5 outlet.T=260 outlet.m=0.1\n"
                                          "boundary Y2 direction:1\nY1.outlet > EV1.cold_inlet\nEV1.cold_outlet > Y2.inlet\nmedium 1 ammonia\n");
  g_autoptr (HlSolution) s = hl_solve (plant, NULL);
  test_assert_solved (s);
  g_assert_cmpfloat (test_value (s, "EV1.superheat"), ==, 0.0);
  const HlFinding *finding = test_finding (s, "leaves-wet");
  g_assert_nonnull (finding);
  g_assert_cmpint (finding->grade, ==, HL_GRADE_CAUTION);
  g_assert_nonnull (strstr (finding->text, "EV1 does not evaporate all of its medium:"));
}

static void
test_findings (void)
{
  g_autofree char *hot = g_strdup_printf (ORGANIC, "30e5");
  test_expect_finding (hot, "near-critical", HL_GRADE_CAUTION, "EV1 evaporates at ");
  test_expect_finding ("expander TX1 exhaust.p=6e5 isentropic_efficiency=0.8\nboundary Y1 direction:0 outlet.p=5e5 outlet.T=400 outlet.m=1\nboundary Y2 direction:1\n"
                       "Y1.outlet > TX1.inlet\nTX1.exhaust > Y2.inlet\nmedium 1 isopentane\n", "pressure-rises", HL_GRADE_ERROR,
                       "TX1 is to expand from 5.000 bar up to 6.000 bar.");
  test_expect_finding ("expander TX1 exhaust.p=1e5 isentropic_efficiency=0.8\nboundary Y1 direction:0 outlet.p=5e5 outlet.T=300 outlet.m=1\nboundary Y2 direction:1\n"
                       "Y1.outlet > TX1.inlet\nTX1.exhaust > Y2.inlet\nmedium 1 isopentane\n", "liquid-at-turbine", HL_GRADE_ERROR, "Liquid reaches TX1: an expander needs vapour.");
  test_expect_finding ("expansion_valve XV1 outlet.p=2e5\nboundary Y1 direction:0 outlet.p=5e5 outlet.x=0.1 outlet.m=1\nboundary Y2 direction:1\n"
                       "Y1.outlet > XV1.inlet\nXV1.outlet > Y2.inlet\nmedium 1 ammonia\n", "flash-gas", HL_GRADE_CAUTION, "Liquid with 10.0 % vapour in it reaches XV1");
  test_expect_finding ("expansion_valve XV1 outlet.p=6e5\nboundary Y1 direction:0 outlet.p=5e5 outlet.x=0 outlet.m=1\nboundary Y2 direction:1\n"
                       "Y1.outlet > XV1.inlet\nXV1.outlet > Y2.inlet\nmedium 1 ammonia\n", "pressure-rises", HL_GRADE_ERROR, "Pressure would rise through XV1");
  test_expect_finding ("evaporator EV1 source:1 superheat=0 cold_pressure_loss=0\nboundary Y1 direction:0 outlet.p=3e5 outlet.T=350 outlet.m=0.1\nboundary Y2 direction:1\n"
                       "Y1.outlet > EV1.cold_inlet\nEV1.cold_outlet > Y2.inlet\nmedium 1 ammonia\n", "heat-runs-backwards", HL_GRADE_ERROR, "EV1 would cool what it is to evaporate");
}

int
main (int argc, char **argv)
{
  g_test_init (&argc, &argv, NULL);
  g_test_add_func ("/engine/reverse/heat-pump", test_heat_pump_by_hand);
  g_test_add_func ("/engine/reverse/without-source", test_evaporator_without_source);
  g_test_add_func ("/engine/reverse/expander", test_expander_in_an_organic_cycle);
  g_test_add_func ("/engine/reverse/derivatives", test_derivatives);
  g_test_add_func ("/engine/reverse/both-ways", test_both_ways);
  g_test_add_func ("/engine/reverse/wet-outlet", test_wet_outlet);
  g_test_add_func ("/engine/reverse/findings", test_findings);
  return g_test_run ();
}
