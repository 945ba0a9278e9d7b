/* The cycle by which media are compared: against its own definition, for wet and dry ones, and where there is none.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "fluid/fluid-cycle.h"
#include <math.h>

/* Efficiencies with 0.85 and 0.65 at 100 and 30 °C are printed by Saleh et al., Energy 32 (2007) 1210 (from memory): isopentane 12.75 %; with an
 * expander of 0.82 in its place the expander's work falls in proportion. */
static void
test_agrees_with_a_printed_efficiency (void)
{
  HlFluidCycle cycle;
  const HlFluid *fluid = hl_fluid_lookup ("isopentane");
  HlSaturation hot, cold;
  HlState pumped;
  hl_fluid_cycle (fluid, 383.15, 293.15, &cycle);
  g_assert_cmpint (cycle.possible, ==, HL_CYCLE_POSSIBLE);
  g_assert_cmpint (hl_fluid_saturation_T (fluid, 373.15, &hot), ==, HL_OK);
  g_assert_cmpint (hl_fluid_saturation_T (fluid, 303.15, &cold), ==, HL_OK);
  g_assert_cmpint (hl_fluid_state_ps (fluid, hot.p, cold.s_liquid, &pumped), ==, HL_OK);
  g_assert_cmpfloat_with_epsilon (cycle.p_evaporation / hot.p, 1.0, 1e-12);
  g_assert_cmpfloat_with_epsilon (cycle.p_condensation / cold.p, 1.0, 1e-12);
  double pump = (pumped.h - cold.h_liquid) / 0.65, heat = hot.h_vapour - cold.h_liquid - pump;
  double printed = ((cycle.efficiency * heat + pump) * 0.85 / 0.82 - pump) / heat;
  g_assert_cmpfloat_with_epsilon (printed, 0.1275, 0.0005);
}

static void
test_dry_and_wet_exhausts (void)
{
  HlFluidCycle dry, wet;
  hl_fluid_cycle (hl_fluid_lookup ("isopentane"), 383.15, 293.15, &dry);
  hl_fluid_cycle (hl_fluid_lookup ("ammonia"), 363.15, 293.15, &wet);
  g_assert_cmpfloat (dry.moisture, ==, 0.0);
  g_assert_cmpfloat (dry.superheat, >, 5.0);
  g_assert_cmpfloat (wet.moisture, >, 0.05);
  g_assert_cmpfloat (wet.superheat, ==, 0.0);
}

static void
test_says_why_there_is_none (void)
{
  static const struct { const char *id; double source, sink; HlCyclePossible possible; } rows[] = {
    { "air", 400.0, 300.0, HL_CYCLE_NO_DOME },
    { "r134a", 400.0, 300.0, HL_CYCLE_ABOVE_CRITICAL },
    { "isopentane", 310.0, 300.0, HL_CYCLE_NO_DIFFERENCE },
    { "water", 400.0, 250.0, HL_CYCLE_BELOW_RANGE },
    { "d4", 500.0, 270.0, HL_CYCLE_BELOW_RANGE },
  };
  for (guint k = 0; k < G_N_ELEMENTS (rows); k++)
    {
      HlFluidCycle cycle;
      hl_fluid_cycle (hl_fluid_lookup (rows[k].id), rows[k].source, rows[k].sink, &cycle);
      g_assert_cmpint (cycle.possible, ==, rows[k].possible);
      g_assert_true (isnan (cycle.efficiency));
    }
}

/* No medium beats Carnot between its own two temperatures. */
static void
test_all_media_stay_below_carnot (void)
{
  g_auto (GStrv) ids = hl_fluid_list ();
  guint n = 0;
  for (guint k = 0; ids[k] != NULL; k++)
    {
      HlFluidCycle cycle;
      hl_fluid_cycle (hl_fluid_lookup (ids[k]), 403.15, 298.15, &cycle);
      if (cycle.possible != HL_CYCLE_POSSIBLE)
        continue;
      n++;
      g_assert_cmpfloat (cycle.efficiency, >, 0.0);
      g_assert_cmpfloat (cycle.efficiency, <, 0.82 * (1.0 - cycle.T_condensation / cycle.T_evaporation));
      g_assert_cmpfloat (cycle.volume_ratio, >, 1.0);
    }
  g_assert_cmpuint (n, >, 20);
}

int
main (int argc, char **argv)
{
  g_test_init (&argc, &argv, NULL);
  g_test_add_func ("/fluid/cycle/printed", test_agrees_with_a_printed_efficiency);
  g_test_add_func ("/fluid/cycle/exhausts", test_dry_and_wet_exhausts);
  g_test_add_func ("/fluid/cycle/impossible", test_says_why_there_is_none);
  g_test_add_func ("/fluid/cycle/carnot", test_all_media_stay_below_carnot);
  return g_test_run ();
}
