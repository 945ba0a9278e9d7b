/* Flash vessel, moisture separator, desuperheater: against hand calculations, both ways, and findings.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "laws.h"
#include <math.h>
#include <string.h>

#define FLASH(words) \
  "boundary Y1 direction:0 outlet.p=40e5 outlet.m=3 " words "\nboundary Y2 direction:1 inlet.p=4e5\nboundary Y3 direction:1\n" \
  "flash_vessel FV1\nY1.outlet > FV1.inlet\nFV1.steam > Y2.inlet\nFV1.drain > Y3.inlet\n"

#define SEPARATE(words) \
  "boundary Y1 direction:0 outlet.p=10e5 outlet.x=0.88 outlet.m=50\nboundary Y2 direction:1\nboundary Y3 direction:1\n" \
  "moisture_separator MS1 " words "\nY1.outlet > MS1.inlet\nMS1.steam > Y2.inlet\nMS1.drain > Y3.inlet\n"

#define SPRAY(words) \
  "boundary Y1 direction:0 outlet.p=40e5 outlet.T=673.15 outlet.m=10\nboundary Y2 direction:0 outlet.p=60e5 outlet.T=400\nboundary Y3 direction:1\n" \
  "desuperheater DS1 pressure_loss=0.02 " words "\nY1.outlet > DS1.steam\nY2.outlet > DS1.spray\nDS1.outlet > Y3.inlet\n"

static HlSaturation
sat (double p)
{
  HlSaturation at;
  g_assert_cmpint (hl_fluid_saturation_p (hl_fluid_water (), p, &at), ==, HL_OK);
  return at;
}

/* Saturated water at 40 bar lets off x = (h'(40) - h'(4)) / (h''(4) - h'(4)). */
static void
test_flash_by_hand (void)
{
  g_autoptr (HlPlant) plant = test_plant (FLASH ("outlet.x=0"));
  g_autoptr (HlSolution) s = hl_solve (plant, NULL);
  test_assert_solved (s);
  test_assert_balanced (s);
  HlSaturation low = sat (4e5);
  double x = (sat (40e5).h_liquid - low.h_liquid) / (low.h_vapour - low.h_liquid);
  test_assert_near (test_value (s, "FV1.flash_fraction"), x, 1e-9);
  test_assert_near (test_value (s, "FV1.steam.m"), 3.0 * x, 1e-9);
  test_assert_near (test_value (s, "FV1.drain.h"), low.h_liquid, 1e-9);
  test_assert_near (test_value (s, "FV1.steam.h"), low.h_vapour, 1e-9);
  /* The diagram shows it: throttled, then parted. */
  g_assert_cmpuint (hl_solution_n_processes (s), ==, 3);
  g_assert_cmpint (hl_solution_process (s, 0)->kind, ==, HL_PROCESS_THROTTLING);
}

static void
test_separator_by_hand (void)
{
  g_autoptr (HlPlant) plant = test_plant (SEPARATE ("separation=0.9 pressure_loss=0.03"));
  g_autoptr (HlSolution) s = hl_solve (plant, NULL);
  test_assert_solved (s);
  test_assert_balanced (s);
  HlSaturation in = sat (10e5), at = sat (9.7e5);
  double h = in.h_liquid + 0.88 * (in.h_vapour - in.h_liquid), y = (at.h_vapour - h) / (at.h_vapour - at.h_liquid);
  test_assert_near (test_value (s, "MS1.inlet_moisture"), y, 1e-9);
  test_assert_near (test_value (s, "MS1.drain.m"), 50.0 * y * 0.9, 1e-9);
  /* A tenth of the water is left in less steam. */
  test_assert_near (test_value (s, "MS1.outlet_moisture"), 0.1 * y / (1.0 - 0.9 * y), 1e-8);
}

static void
test_spray_by_hand (void)
{
  g_autoptr (HlPlant) plant = test_plant (SPRAY ("outlet.T=540"));
  g_autoptr (HlSolution) s = hl_solve (plant, NULL);
  test_assert_solved (s);
  test_assert_balanced (s);
  HlState steam, water, out;
  g_assert_cmpint (hl_fluid_state_pT (hl_fluid_water (), 40e5, 673.15, &steam), ==, HL_OK);
  g_assert_cmpint (hl_fluid_state_pT (hl_fluid_water (), 60e5, 400.0, &water), ==, HL_OK);
  g_assert_cmpint (hl_fluid_state_pT (hl_fluid_water (), 39.2e5, 540.0, &out), ==, HL_OK);
  test_assert_near (test_value (s, "DS1.spray.m"), 10.0 * (steam.h - out.h) / (out.h - water.h), 1e-9);
  test_assert_near (test_value (s, "DS1.outlet_superheat"), 540.0 - sat (39.2e5).T, 1e-9);
}

static void
test_derivatives (void)
{
  test_check_derivatives (FLASH ("outlet.x=0"));
  test_check_derivatives (SEPARATE ("separation=0.9 pressure_loss=0.03"));
  test_check_derivatives (SPRAY ("outlet.T=540"));
}

static void
test_both_ways (void)
{
  g_assert_cmpuint (test_give_each (FLASH ("outlet.T=500")), >, 0);
  g_assert_cmpuint (test_give_each (SEPARATE ("separation=0.9 pressure_loss=0.03")), >, 1);
  g_assert_cmpuint (test_give_each (SPRAY ("outlet.T=540")), >, 1);
}

static void
test_findings (void)
{
  test_expect_finding (FLASH ("outlet.T=380"), "nothing-flashes", HL_GRADE_ERROR, "What flows into FV1 is too cold to flash at 4.000 bar.");
  test_expect_finding (FLASH ("outlet.T=700"), "nothing-to-part", HL_GRADE_ERROR, "Superheated steam flows into FV1");
  test_expect_finding (SPRAY ("outlet.T=700"), "heat-runs-backwards", HL_GRADE_ERROR, "Steam comes into DS1 at 400.0 °C and is to leave hotter, at 426.9 °C");
  test_expect_finding (SPRAY ("outlet_superheat=2"), "small-superheat", HL_GRADE_CAUTION, "Steam leaves DS1 less than 5 K above saturation");
}

int
main (int argc, char **argv)
{
  g_test_init (&argc, &argv, NULL);
  g_test_add_func ("/engine/vessels/flash-by-hand", test_flash_by_hand);
  g_test_add_func ("/engine/vessels/separator-by-hand", test_separator_by_hand);
  g_test_add_func ("/engine/vessels/spray-by-hand", test_spray_by_hand);
  g_test_add_func ("/engine/vessels/derivatives", test_derivatives);
  g_test_add_func ("/engine/vessels/both-ways", test_both_ways);
  g_test_add_func ("/engine/vessels/findings", test_findings);
  return g_test_run ();
}
