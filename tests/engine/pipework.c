/* Ejector, gland seal, control stage, hotwell, header, letdown station, drain pump, treatment and vent: against hand calculations,
 * both ways, and findings.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "laws.h"
#include <math.h>
#include <string.h>

static double
h_pT (double p, double T)
{
  HlState st;
  g_assert_cmpint (hl_fluid_state_pT (hl_fluid_water (), p, T, &st), ==, HL_OK);
  return st.h;
}

static HlSolution *
solved (const char *text)
{
  g_autoptr (HlPlant) plant = test_plant (text);
  HlSolution *s = hl_solve (plant, NULL);
  test_assert_solved (s);
  test_assert_balanced (s);
  return s;
}

/* --- ejector -------------------------------------------------------------------- */

#define EJECT(words) \
  "boundary Y1 direction:0 outlet.p=10e5 outlet.T=500 outlet.m=4\nboundary Y2 direction:0 outlet.p=1e5 outlet.x=1\nboundary Y3 direction:1\n" \
  "ejector EJ1 " words "\nY1.outlet > EJ1.motive\nY2.outlet > EJ1.suction\nEJ1.outlet > Y3.inlet\n"

static void
test_ejector_by_hand (void)
{
  g_autoptr (HlSolution) s = solved (EJECT ("entrainment_ratio=0.5 outlet.p=2e5"));
  HlSaturation low;
  g_assert_cmpint (hl_fluid_saturation_p (hl_fluid_water (), 1e5, &low), ==, HL_OK);
  test_assert_near (test_value (s, "EJ1.suction.m"), 2.0, 1e-10);
  test_assert_near (test_value (s, "EJ1.outlet.h"), (4.0 * h_pT (10e5, 500.0) + 2.0 * low.h_vapour) / 6.0, 1e-10);
  test_assert_near (test_value (s, "EJ1.compression_ratio"), 2.0, 1e-10);
  test_assert_near (test_value (s, "EJ1.expansion_ratio"), 10.0, 1e-10);
}

/* --- gland seal ------------------------------------------------------------------ */

#define LEAK(words) \
  "boundary Y1 direction:0 outlet.p=60e5 outlet.T=750 outlet.m=20\nboundary Y2 direction:1\nboundary Y3 direction:1 " words "\n" \
  "gland_seal GS1 leak_fraction=0.01\nY1.outlet > GS1.inlet\nGS1.outlet > Y2.inlet\nGS1.leak > Y3.inlet\n"

static void
test_gland_seal_by_hand (void)
{
  g_autoptr (HlSolution) s = solved (LEAK ("inlet.p=1.1e5"));
  test_assert_near (test_value (s, "GS1.leak.m"), 0.2, 1e-12);
  test_assert_near (test_value (s, "GS1.outlet.m"), 19.8, 1e-12);
  test_assert_near (test_value (s, "GS1.outlet.p"), 60e5, 1e-12);
  test_assert_near (test_value (s, "GS1.leak.p"), 1.1e5, 1e-12);
  test_assert_near (test_value (s, "GS1.leak.h"), h_pT (60e5, 750.0), 1e-12);
}

/* --- control stage --------------------------------------------------------------- */

#define STAGE \
  "heat_input Q1 pressure_loss=0 steam.T=750\ncontrol_stage CS1 inlet.p=60e5 inlet.m=10 pressure_ratio=0.7 isentropic_efficiency=0.6 mechanical_efficiency=0.98\n" \
  "turbine T1 exhaust.p=1e4 isentropic_efficiency=0.82 mechanical_efficiency=0.98\ngenerator G1 efficiency=0.97\n" \
  "condenser C1 cooling:1 subcooling=0\npump P1 isentropic_efficiency=0.7 motor_efficiency=0.95\n" \
  "Q1.steam > CS1.inlet\nCS1.exhaust > T1.inlet\nT1.exhaust > C1.steam\nC1.condensate > P1.inlet\nP1.outlet > Q1.feed\n" \
  "shaft CS1 T1 G1\nplant other_consumption_fraction=0\n"

static void
test_control_stage_by_hand (void)
{
  g_autoptr (HlSolution) s = solved (STAGE);
  HlState in, end;
  g_assert_cmpint (hl_fluid_state_pT (hl_fluid_water (), 60e5, 750.0, &in), ==, HL_OK);
  g_assert_cmpint (hl_fluid_state_ps (hl_fluid_water (), 42e5, in.s, &end), ==, HL_OK);
  test_assert_near (test_value (s, "CS1.exhaust.p"), 42e5, 1e-10);
  test_assert_near (test_value (s, "CS1.power"), 10.0 * 0.6 * (in.h - end.h) * 0.98, 1e-9);
  test_assert_near (test_value (s, "G1.shaft_power"), test_value (s, "CS1.power") + test_value (s, "T1.power"), 1e-10);
}

/* --- hotwell and header ------------------------------------------------------------- */

#define COLLECT(T2) \
  "boundary Y1 direction:0 outlet.p=1e5 outlet.T=320 outlet.m=30\nboundary Y2 direction:0 outlet." T2 " outlet.m=3\nboundary Y3 direction:1\n" \
  "hotwell HW1 inlets:2\nY1.outlet > HW1.inlet1\nY2.outlet > HW1.inlet2\nHW1.outlet > Y3.inlet\n"

static void
test_hotwell_by_hand (void)
{
  g_autoptr (HlSolution) s = solved (COLLECT ("T=340"));
  test_assert_near (test_value (s, "HW1.outlet.h"), (30.0 * h_pT (1e5, 320.0) + 3.0 * h_pT (1e5, 340.0)) / 33.0, 1e-12);
  g_autoptr (HlSolution) one = solved ("boundary Y1 direction:0 outlet.p=1e5 outlet.T=320 outlet.m=30\nboundary Y3 direction:1\n"
                                       "hotwell HW1 inlets:1\nY1.outlet > HW1.inlet1\nHW1.outlet > Y3.inlet\n");
  test_assert_near (test_value (one, "HW1.outlet.h"), h_pT (1e5, 320.0), 1e-12);
}

#define MAIN(inlets, more) \
  "boundary Y1 direction:0 outlet.p=40e5 outlet.T=700 outlet.m=10\nboundary Y3 direction:1\nboundary Y4 direction:1\nboundary Y5 direction:1\n" more \
  "header HD1 inlets:" inlets " outlets:3 outlet2.m=4 outlet3.m=2\nY1.outlet > HD1.inlet1\nHD1.outlet1 > Y3.inlet\nHD1.outlet2 > Y4.inlet\nHD1.outlet3 > Y5.inlet\n"

static void
test_header_by_hand (void)
{
  g_autoptr (HlSolution) s = solved (MAIN ("2", "boundary Y2 direction:0 outlet.T=600 outlet.m=5\n") "Y2.outlet > HD1.inlet2\n");
  double h = (10.0 * h_pT (40e5, 700.0) + 5.0 * h_pT (40e5, 600.0)) / 15.0;
  for (int k = 1; k <= 3; k++)
    {
      g_autofree char *address = g_strdup_printf ("HD1.outlet%d.h", k);
      test_assert_near (test_value (s, address), h, 1e-11);
    }
  test_assert_near (test_value (s, "HD1.outlet1.m"), 9.0, 1e-12);
  g_autoptr (HlSolution) one = solved (MAIN ("1", ""));
  test_assert_near (test_value (one, "HD1.outlet3.h"), h_pT (40e5, 700.0), 1e-12);
  test_assert_near (test_value (one, "HD1.outlet1.m"), 4.0, 1e-12);
}

/* --- letdown station ------------------------------------------------------------------ */

#define LETDOWN(words) \
  "boundary Y1 direction:0 outlet.p=60e5 outlet.T=750 outlet.m=10\nboundary Y2 direction:0 outlet.p=70e5 outlet.T=400\nboundary Y3 direction:1\n" \
  "bypass_station BP1 " words "\nY1.outlet > BP1.steam\nY2.outlet > BP1.spray\nBP1.outlet > Y3.inlet\n"

static void
test_letdown_by_hand (void)
{
  g_autoptr (HlSolution) s = solved (LETDOWN ("outlet.p=6e5 outlet.T=470"));
  double out = h_pT (6e5, 470.0);
  test_assert_near (test_value (s, "BP1.spray.m"), 10.0 * (h_pT (60e5, 750.0) - out) / (out - h_pT (70e5, 400.0)), 1e-9);
  /* Throttled first, then sprayed. */
  g_assert_cmpuint (hl_solution_n_processes (s), ==, 3);
  g_assert_cmpint (hl_solution_process (s, 0)->kind, ==, HL_PROCESS_THROTTLING);
  test_assert_near (hl_solution_process (s, 0)->to.p, 6e5, 1e-10);
}

/* --- drain pump: drain of a heater into the feed behind it -------------------------------- */

#define FORWARD \
  "boundary Y1 direction:0 outlet.p=2e5 outlet.T=450\nboundary Y2 direction:0 outlet.p=10e5 outlet.T=320 outlet.m=50\nboundary Y3 direction:1\n" \
  "closed_heater H1 terminal_difference=3 drain_subcooling=2 feed_pressure_loss=0\ndrain_pump DP1 isentropic_efficiency=0.72 motor_efficiency=0.95\nmixer M1 inlets:2\n" \
  "Y1.outlet > H1.steam\nY2.outlet > H1.feed_inlet\nH1.feed_outlet > M1.inlet1\nH1.drain > DP1.inlet\nDP1.outlet > M1.inlet2\nM1.outlet > Y3.inlet\n"

static void
test_drain_pump_by_hand (void)
{
  g_autoptr (HlSolution) s = solved (FORWARD);
  double m = test_value (s, "H1.drain.m");
  HlState end;
  g_assert_cmpint (hl_fluid_state_ps (hl_fluid_water (), 10e5, test_value (s, "H1.drain.s"), &end), ==, HL_OK);
  test_assert_near (test_value (s, "DP1.power"), m * (end.h - test_value (s, "H1.drain.h")) / 0.72, 1e-6);
  test_assert_near (test_value (s, "M1.outlet.m"), 50.0 + m, 1e-12);
}

/* --- treatment and vent ------------------------------------------------------------------- */

#define DEAERATE(words, vent) \
  "boundary Y1 direction:0 outlet.p=1.4e5 outlet.T=450\nmake_up W1 " words " outlet.T=288.15 outlet.m=5\nboundary Y3 direction:1\n" \
  "open_heater D1 inlets:1 outlet_subcooling=0 " vent "\nY1.outlet > D1.steam\nW1.outlet > D1.inlet1\nD1.outlet > Y3.inlet\n"

static void
test_treatment_by_hand (void)
{
  g_autoptr (HlSolution) s = solved (DEAERATE ("treatment:1 treatment_loss=0.2", ""));
  test_assert_near (test_value (s, "W1.raw_flow"), 6.25, 1e-12);
}

static void
test_vent_by_hand (void)
{
  g_autoptr (HlSolution) s = solved (DEAERATE ("", "vent:1 vent_fraction=0.002"));
  HlSaturation sat;
  g_assert_cmpint (hl_fluid_saturation_p (hl_fluid_water (), 1.4e5, &sat), ==, HL_OK);
  /* With o flowing out: steam + water = o + v, steam h + water h = o h' + v h'', v = 0.002 o. */
  double h_s = h_pT (1.4e5, 450.0), h_w = h_pT (1.4e5, 288.15);
  double out = 5.0 * (h_s - h_w) / (h_s - sat.h_liquid + 0.002 * (h_s - sat.h_vapour));
  test_assert_near (test_value (s, "D1.outlet.m"), out, 1e-10);
  test_assert_near (test_value (s, "D1.vent_flow"), 0.002 * out, 1e-10);
  test_assert_near (test_value (s, "D1.steam.m"), 1.002 * out - 5.0, 1e-9);
}

/* --- all of them ------------------------------------------------------------------------------ */

static void
test_derivatives (void)
{
  test_check_derivatives (EJECT ("entrainment_ratio=0.5 outlet.p=2e5"));
  test_check_derivatives (LEAK ("inlet.p=1.1e5"));
  test_check_derivatives (STAGE);
  test_check_derivatives (COLLECT ("T=340"));
  test_check_derivatives (MAIN ("2", "boundary Y2 direction:0 outlet.T=600 outlet.m=5\n") "Y2.outlet > HD1.inlet2\n");
  test_check_derivatives (LETDOWN ("outlet.p=6e5 outlet.T=470"));
  test_check_derivatives (FORWARD);
  test_check_derivatives (DEAERATE ("treatment:1 treatment_loss=0.2", "vent:1 vent_fraction=0.002"));
}

static void
test_both_ways (void)
{
  g_assert_cmpuint (test_give_each (EJECT ("entrainment_ratio=0.5 outlet.p=2e5")), >=, 2);
  g_assert_cmpuint (test_give_each (LEAK ("inlet.p=1.1e5")), >=, 1);
  g_assert_cmpuint (test_give_each (STAGE), >, 10);
  g_assert_cmpuint (test_give_each (LETDOWN ("outlet.p=6e5 outlet.T=470")), >=, 2);
  g_assert_cmpuint (test_give_each (FORWARD), >=, 5);
  g_assert_cmpuint (test_give_each (DEAERATE ("treatment:1 treatment_loss=0.2", "vent:1 vent_fraction=0.002")), >=, 3);
}

static void
test_findings (void)
{
  test_expect_finding (EJECT ("entrainment_ratio=0.5 outlet.p=12e5"), "pressure-rises", HL_GRADE_ERROR,
                       "Ejector EJ1 is to deliver at 12.00 bar, above its motive steam's 10.00 bar. Lower the outlet pressure.");
  test_expect_finding (EJECT ("entrainment_ratio=0.5 outlet.p=0.8e5"), "nothing-to-lift", HL_GRADE_ERROR,
                       "Ejector EJ1 is to lift from 1.000 bar down to 0.8000 bar: a mixer and a valve do that. Raise the outlet pressure.");
  /* More entrained than the motive steam can lift. */
  test_expect_finding (EJECT ("entrainment_ratio=3 outlet.p=6e5"), "entropy-destroyed", HL_GRADE_ERROR, "EJ1 would destroy entropy");
  test_expect_finding (LEAK ("inlet.p=70e5"), "pressure-rises", HL_GRADE_ERROR,
                       "Steam cannot leak from gland GS1 at 60.00 bar into 70.00 bar. Lead the leak-off to a lower pressure.");
  test_expect_finding (COLLECT ("x=1"), "hotwell-steam", HL_GRADE_WARNING, "What flows into hotwell HW1 would leave it with");
  test_expect_finding (LETDOWN ("outlet.p=65e5 outlet.T=700"), "pressure-rises", HL_GRADE_ERROR,
                       "Station BP1 is to let steam down from 60.00 bar to 65.00 bar, which is no lower. Lower the pressure behind it.");
  test_expect_finding (LETDOWN ("outlet.p=6e5 outlet.T=760"), "heat-runs-backwards", HL_GRADE_ERROR, "a spray only cools");
}

/* --- what loses water, and where a valve helps ---------------------------------------------------- */

#define LOOP(heater, more) \
  "heat_input Q1 pressure_loss=0 steam.T=700\nturbine T1 extractions:1 inlet.p=40e5 extraction1.p=2e5 exhaust.p=1e4 isentropic_efficiency=0.8 mechanical_efficiency=0.98\n" \
  "condenser C1 cooling:1 subcooling=0\npump P1 isentropic_efficiency=0.7 motor_efficiency=0.95\npump P2 isentropic_efficiency=0.7 motor_efficiency=0.95\n" \
  "open_heater D1 inlets:1 outlet_subcooling=0" heater "\n" more "T1.extraction1 > D1.steam\nT1.exhaust > C1.steam\nC1.condensate > P1.inlet\nP1.outlet > D1.inlet1\n" \
  "D1.outlet > P2.inlet\nP2.outlet > Q1.feed\nplant net_power=5e6 other_consumption_fraction=0\n"
#define PLAIN "Q1.steam > T1.inlet\n"

static void
test_leaks_are_named (void)
{
  test_expect_finding (LOOP (" vent:1 vent_fraction=0.001", PLAIN), "no-make-up", HL_GRADE_ERROR,
                       "D1 lets steam off at its vent, and its circuit has no make-up water. Add a make-up, or let nothing off.");
  test_expect_finding (LOOP ("", "gland_seal GS1 leak_fraction=0.01\nboundary Y1 direction:1 inlet.p=1e5\nQ1.steam > GS1.inlet\nGS1.outlet > T1.inlet\nGS1.leak > Y1.inlet\n"),
                       "no-make-up", HL_GRADE_ERROR, "At Y1 water leaves its circuit, which has no make-up water. Add a make-up, or lead it back.");
  /* Nothing let off closes the circuit. */
  g_autoptr (HlSolution) s = solved (LOOP (" vent:1 vent_fraction=0", PLAIN));
  g_assert_cmpfloat (test_value (s, "D1.vent_flow"), ==, 0.0);
}

static void
test_no_valve_before_what_throttles (void)
{
  const char *meet = "boundary Y1 direction:0 outlet.p=10e5 outlet.T=440 outlet.m=3\nboundary Y2 direction:1\nboundary Y3 direction:1\nflash_vessel FV1 steam.p=4e5 inlet.p=8e5\n"
                     "Y1.outlet > FV1.inlet\nFV1.steam > Y2.inlet\nFV1.drain > Y3.inlet\n";
  g_autoptr (HlPlant) plant = test_plant (meet);
  g_autoptr (HlSolution) s = hl_solve (plant, NULL);
  const HlFinding *finding = test_finding (s, "pressures-meet");
  g_assert_nonnull (finding);
  g_assert_null (strstr (finding->text, "valve"));
  for (guint k = 0; k < finding->n_mends; k++)
    g_assert_cmpint (finding->mends[k].kind, !=, HL_MEND_INSERT_VALVE);
}

int
main (int argc, char **argv)
{
  g_test_init (&argc, &argv, NULL);
  g_test_add_func ("/engine/pipework/ejector-by-hand", test_ejector_by_hand);
  g_test_add_func ("/engine/pipework/gland-seal-by-hand", test_gland_seal_by_hand);
  g_test_add_func ("/engine/pipework/control-stage-by-hand", test_control_stage_by_hand);
  g_test_add_func ("/engine/pipework/hotwell-by-hand", test_hotwell_by_hand);
  g_test_add_func ("/engine/pipework/header-by-hand", test_header_by_hand);
  g_test_add_func ("/engine/pipework/letdown-by-hand", test_letdown_by_hand);
  g_test_add_func ("/engine/pipework/drain-pump-by-hand", test_drain_pump_by_hand);
  g_test_add_func ("/engine/pipework/treatment-by-hand", test_treatment_by_hand);
  g_test_add_func ("/engine/pipework/vent-by-hand", test_vent_by_hand);
  g_test_add_func ("/engine/pipework/derivatives", test_derivatives);
  g_test_add_func ("/engine/pipework/both-ways", test_both_ways);
  g_test_add_func ("/engine/pipework/findings", test_findings);
  g_test_add_func ("/engine/pipework/leaks-are-named", test_leaks_are_named);
  g_test_add_func ("/engine/pipework/no-valve-before-what-throttles", test_no_valve_before_what_throttles);
  return g_test_run ();
}
