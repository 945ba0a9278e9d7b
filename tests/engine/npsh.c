/* Elevations and NPSH: against hand calculations, settling, and findings.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "laws.h"
#include <math.h>

/* Saturated feed water from a deaerator through a pipe to its pump. */
#define FEED(vessel, pump) \
  "boundary Y1 direction:0 outlet.p=1.4e5 outlet.T=450\nmake_up W1 outlet.T=350 outlet.m=5\nboundary Y3 direction:1 inlet.p=60e5\n" \
  "open_heater D1 inlets:1 outlet_subcooling=0 " vessel "\npipe L1 pressure_loss=0 heat_loss=0\npump P1 suction:1 isentropic_efficiency=0.75 motor_efficiency=0.95 " pump "\n" \
  "Y1.outlet > D1.steam\nW1.outlet > D1.inlet1\nD1.outlet > L1.inlet\nL1.outlet > P1.inlet\nP1.outlet > Y3.inlet\n"

/* Cold water, far from boiling. */
#define COLD(pump) \
  "boundary Y1 direction:0 outlet.p=2e5 outlet.T=320 outlet.m=5\nboundary Y3 direction:1 inlet.p=10e5\n" \
  "pump P1 suction:1 isentropic_efficiency=0.75 motor_efficiency=0.95 " pump "\nY1.outlet > P1.inlet\nP1.outlet > Y3.inlet\n"

static HlSolution *
solved (const char *text)
{
  g_autoptr (HlPlant) plant = test_plant (text);
  HlSolution *s = hl_solve (plant, NULL);
  test_assert_solved (s);
  return s;
}

/* For a saturated liquid NPSH is the static head less friction; the head is what lies between level and pump. */
static void
test_saturated_suction (void)
{
  g_autoptr (HlSolution) s = solved (FEED ("elevation=12", "elevation=0.5 suction_loss=0.6 npsh_required=4"));
  test_assert_near (test_value (s, "P1.static_head"), 11.5, 1e-12);
  g_assert_cmpfloat_with_epsilon (test_value (s, "P1.npsh_available"), 10.9, 2e-3);
  g_assert_null (test_finding (s, "npsh"));
}

/* 998 kg/m3 or so: the pressure above saturation as a head of that water. */
static void
test_cold_suction (void)
{
  g_autoptr (HlSolution) s = solved (COLD ("static_head=-3 suction_loss=0.5 npsh_required=3"));
  HlState in;
  HlSaturation sat;
  g_assert_cmpint (hl_fluid_state_pT (hl_fluid_water (), 2e5, 320.0, &in), ==, HL_OK);
  g_assert_cmpint (hl_fluid_saturation_T (hl_fluid_water (), 320.0, &sat), ==, HL_OK);
  test_assert_near (test_value (s, "P1.npsh_available"), -3.5 + (2e5 - sat.p) * in.v / 9.80665, 1e-9);
}

/* Without a vessel's elevation the static head is what was put in. */
static void
test_head_without_elevation (void)
{
  g_autoptr (HlSolution) s = solved (FEED ("", "elevation=0.5 static_head=7 suction_loss=0.5"));
  g_assert_cmpfloat_with_epsilon (test_value (s, "P1.npsh_available"), 6.5, 2e-3);
}

/* An elevation typed at the vessel: the pump's assumed head gives way, and comes back. */
static void
test_elevation_settles (void)
{
  HlPlant *plant = test_plant (FEED ("", "~elevation=0 ~static_head=5 ~suction_loss=0.5"));
  HlAddress elevation = hl_address_component (g_intern_static_string ("D1"), g_intern_static_string ("elevation"));
  plant = test_plant_set (plant, "D1.elevation", 9.0);
  GArray *yielded;
  HlPlant *settled = hl_settle (plant, &elevation, &yielded);
  hl_plant_unref (plant);
  g_assert_cmpuint (yielded->len, ==, 1);
  g_assert_cmpstr (g_array_index (yielded, HlYield, 0).text, ==, "static head of P1 is now found");
  g_array_unref (yielded);
  g_autoptr (HlSolution) s = hl_solve (settled, NULL);
  test_assert_solved (s);
  test_assert_near (test_value (s, "P1.static_head"), 9.0, 1e-12);
  HlPlant *open = test_plant_let_go (settled, "D1.elevation");
  g_autoptr (HlPlant) again = hl_settle (open, &elevation, &yielded);
  hl_plant_unref (open);
  g_assert_cmpuint (yielded->len, ==, 1);
  g_assert_cmpstr (g_array_index (yielded, HlYield, 0).text, ==, "static head of P1 is assumed again");
  g_array_unref (yielded);
}

/* How high must the deaerator stand?  NPSH given, its elevation found. */
static void
test_elevation_found (void)
{
  g_autoptr (HlPlant) plant = test_plant (COLD ("suction_loss=0.5 npsh_available=12"));
  g_autoptr (HlSolution) s = hl_solve (plant, NULL);
  test_assert_solved (s);
  HlState in;
  HlSaturation sat;
  g_assert_cmpint (hl_fluid_state_pT (hl_fluid_water (), 2e5, 320.0, &in), ==, HL_OK);
  g_assert_cmpint (hl_fluid_saturation_T (hl_fluid_water (), 320.0, &sat), ==, HL_OK);
  test_assert_near (test_value (s, "P1.static_head"), 12.5 - (2e5 - sat.p) * in.v / 9.80665, 1e-8);
}

static void
test_derivatives (void)
{
  test_check_derivatives (FEED ("elevation=12", "elevation=0.5 suction_loss=0.6 npsh_required=4"));
  test_check_derivatives (COLD ("static_head=-3 suction_loss=0.5 npsh_required=3"));
}

static void
test_findings (void)
{
  test_expect_finding (FEED ("elevation=3", "elevation=0 suction_loss=0.5 npsh_required=4"), "npsh", HL_GRADE_WARNING,
                       "less than the 4.00 m required: it would cavitate. Raise the vessel, lower the pump, or cut the loss of its suction line.");
  test_expect_finding (FEED ("elevation=6", "elevation=0 suction_loss=0.5 npsh_required=4"), "npsh", HL_GRADE_CAUTION,
                       "4.00 m required; 1.8 to 2.5 times as much is usual, for when the deaerator's pressure falls (POWER magazine).");
  test_expect_finding (COLD ("static_head=-15.8 suction_loss=0.5 npsh_required=3"), "npsh", HL_GRADE_CAUTION,
                       "for 3.00 m required; a tenth or 0.6 m more is usual (ANSI/HI 9.6.1).");
  test_expect_finding (FEED ("", "static_head=0 suction_loss=0.5 npsh_required=4"), "suction-saturated", HL_GRADE_WARNING,
                       "P1 draws saturated liquid without static head: it would boil at the pump. Raise the vessel above it, or lower the pump.");
}

int
main (int argc, char **argv)
{
  g_test_init (&argc, &argv, NULL);
  g_test_add_func ("/engine/npsh/saturated-suction", test_saturated_suction);
  g_test_add_func ("/engine/npsh/cold-suction", test_cold_suction);
  g_test_add_func ("/engine/npsh/head-without-elevation", test_head_without_elevation);
  g_test_add_func ("/engine/npsh/elevation-settles", test_elevation_settles);
  g_test_add_func ("/engine/npsh/elevation-found", test_elevation_found);
  g_test_add_func ("/engine/npsh/derivatives", test_derivatives);
  g_test_add_func ("/engine/npsh/findings", test_findings);
  return g_test_run ();
}
