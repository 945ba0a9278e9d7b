/* Zones of a closed heater: they come and go without a jump, and their derivatives hold in each regime.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "plants.h"
#include "engine/heater-zones.h"
#include <math.h>

/* 10 kg/s of steam at 5 bar heat 100 kg/s of feedwater; the feed outlet follows from the balance. */
static void
inputs_at (double h_steam, double h_drain, double *x)
{
  x[HL_ZONES_P] = log (5e5);
  x[HL_ZONES_M_STEAM] = 10.0;
  x[HL_ZONES_H_STEAM] = h_steam;
  x[HL_ZONES_M_DRAIN] = 10.0;
  x[HL_ZONES_H_DRAIN] = h_drain;
  x[HL_ZONES_M_FEED] = 100.0;
  x[HL_ZONES_P_IN] = log (60e5);
  x[HL_ZONES_H_IN] = 380e3;
  x[HL_ZONES_P_OUT] = log (59e5);
  x[HL_ZONES_H_OUT] = 380e3 + 10.0 * (h_steam - h_drain) / 100.0;
}

static double
conductance_at (double h_steam, double h_drain, HlHeaterZones *zones)
{
  double x[HL_N_ZONE_INPUTS];
  inputs_at (h_steam, h_drain, x);
  g_assert_cmpint (hl_heater_zones (hl_fluid_water (), hl_fluid_water (), x, zones), ==, HL_OK);
  return zones->conductance[0] + zones->conductance[1] + zones->conductance[2];
}

/* Superheated to wet steam, subcooled to saturated drain: no jump at either switch. */
static void
test_zones_come_and_go (void)
{
  HlHeaterZones zones;
  HlSaturation sat;
  double last = NAN;
  g_assert_cmpint (hl_fluid_saturation_p (hl_fluid_water (), 5e5, &sat), ==, HL_OK);
  for (double h = sat.h_vapour + 50e3; h > sat.h_vapour - 50e3; h -= 500.0)
    {
      double ua = conductance_at (h, sat.h_liquid - 1e4, &zones);
      g_assert_true ((zones.heat[HL_ZONE_DESUPERHEATING] > 0.0) == (h > sat.h_vapour));
      if (!isnan (last))
        g_assert_cmpfloat (fabs (ua / last - 1.0), <, 2e-3);
      last = ua;
    }
  last = NAN;
  for (double h = sat.h_liquid - 40e3; h < sat.h_liquid + 2e3; h += 500.0)
    {
      double ua = conductance_at (sat.h_vapour + 1e5, h, &zones);
      g_assert_true ((zones.heat[HL_ZONE_SUBCOOLING] > 0.0) == (h < sat.h_liquid));
      if (!isnan (last))
        g_assert_cmpfloat (fabs (ua / last - 1.0), <, 2e-2);
      last = ua;
    }
}

/* Heats add up, and borders are hot side above feed side. */
static void
test_zones_add_up (void)
{
  HlHeaterZones zones;
  HlSaturation sat;
  g_assert_cmpint (hl_fluid_saturation_p (hl_fluid_water (), 5e5, &sat), ==, HL_OK);
  conductance_at (sat.h_vapour + 2e5, sat.h_liquid - 4e4, &zones);
  test_assert_near (zones.heat[0] + zones.heat[1] + zones.heat[2], 10.0 * (sat.h_vapour + 2e5 - sat.h_liquid + 4e4), 1e-12);
  test_assert_near (zones.heat[HL_ZONE_DESUPERHEATING], 10.0 * 2e5, 1e-9);
  test_assert_near (zones.heat[HL_ZONE_SUBCOOLING], 10.0 * 4e4, 1e-9);
  test_assert_near (zones.hot_in[HL_ZONE_CONDENSING], sat.T, 1e-12);
  for (int k = 0; k < HL_N_ZONES; k++)
    {
      g_assert_cmpfloat (zones.hot_in[k], >, zones.feed_out[k]);
      g_assert_cmpfloat (zones.hot_out[k], >, zones.feed_in[k]);
      double unused, d1 = zones.hot_in[k] - zones.feed_out[k], d2 = zones.hot_out[k] - zones.feed_in[k];
      test_assert_near (zones.conductance[k], zones.heat[k] / hl_log_mean (d1, d2, &unused, &unused), 1e-12);
    }
}

static void
test_derivatives_in_each_regime (void)
{
  static const double steams[] = { 2.9e6, 2.6e6 }, drains[] = { 6.0e5, 6.6e5 };
  for (int regime = 0; regime < 4; regime++)
    {
      g_autoptr (HlSystem) system = hl_system_new ();
      double x[HL_N_ZONE_INPUTS], r, up, down, dr[HL_N_ZONE_INPUTS + 1], unused[HL_N_ZONE_INPUTS + 1];
      int vars[HL_N_ZONE_INPUTS];
      static const HlVarKind kinds[] = { HL_VAR_PRESSURE, HL_VAR_FLOW, HL_VAR_ENTHALPY, HL_VAR_FLOW, HL_VAR_ENTHALPY,
                                         HL_VAR_FLOW, HL_VAR_PRESSURE, HL_VAR_ENTHALPY, HL_VAR_PRESSURE, HL_VAR_ENTHALPY };
      inputs_at (steams[regime / 2], drains[regime % 2], x);
      for (int k = 0; k < HL_N_ZONE_INPUTS; k++)
        vars[k] = hl_system_add_var (system, kinds[k], hl_address_plant (g_intern_static_string ("")), x[k]);
      int ua = hl_system_add_var (system, HL_VAR_CONDUCTANCE, hl_address_plant (g_intern_static_string ("")), 5e5);
      hl_add_heater_conductance (system, hl_fluid_water (), hl_fluid_water (), vars, ua);
      hl_system_close (system);
      g_assert_cmpint (hl_system_evaluate (system, 0, &r, dr), ==, HL_OK);
      for (int k = 0; k < HL_N_ZONE_INPUTS; k++)
        {
          double h = 1e-6 * fabs (x[k]);
          system->x[k] = x[k] + h;
          g_assert_cmpint (hl_system_evaluate (system, 0, &up, unused), ==, HL_OK);
          system->x[k] = x[k] - h;
          g_assert_cmpint (hl_system_evaluate (system, 0, &down, unused), ==, HL_OK);
          system->x[k] = x[k];
          if (!(fabs ((up - down) / (2.0 * h) - dr[k]) <= 1e-5 * fabs (dr[k]) + 1e-4 * fabs (r / x[k])))
            g_error ("regime %d, derivative %d: %.10g, by differences %.10g", regime, k, dr[k], (up - down) / (2.0 * h));
        }
    }
}

/* Conductance given instead of the terminal difference, found from it, and the other way round. */
static void
test_conductance_and_difference_are_one (void)
{
  g_autoptr (HlPlant) plant = test_plant (test_reheat_plant);
  g_autoptr (HlSolution) s = hl_solve (plant, NULL);
  test_assert_solved (s);
  double ua = test_value (s, "H1.UA");
  g_autoptr (HlPlant) sized = test_plant_set (test_plant_let_go (test_plant (test_reheat_plant), "H1.terminal_difference"), "H1.UA", ua);
  g_autoptr (HlSolution) t = hl_solve (sized, NULL);
  test_assert_solved (t);
  test_assert_near (test_value (t, "H1.terminal_difference"), 3.0, 1e-6);
  /* Down to nearly no surface at all, and up to a very large one. */
  for (double factor = 0.3; factor < 3.0; factor *= 1.25)
    {
      g_autoptr (HlPlant) other = test_plant_set (test_plant_let_go (test_plant (test_reheat_plant), "H1.terminal_difference"), "H1.UA", factor * ua);
      g_autoptr (HlSolution) o = hl_solve (other, t);
      test_assert_solved (o);
      g_assert_true ((test_value (o, "H1.terminal_difference") < 3.0) == (factor > 1.0));
      test_assert_near (test_value (o, "H1.UA"), factor * ua, 1e-9);
    }
}

int
main (int argc, char **argv)
{
  g_test_init (&argc, &argv, NULL);
  g_test_add_func ("/engine/heater-zones/come-and-go", test_zones_come_and_go);
  g_test_add_func ("/engine/heater-zones/add-up", test_zones_add_up);
  g_test_add_func ("/engine/heater-zones/derivatives", test_derivatives_in_each_regime);
  g_test_add_func ("/engine/heater-zones/conductance-and-difference", test_conductance_and_difference_are_one);
  return g_test_run ();
}
