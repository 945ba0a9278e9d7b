/* Gas below its dew point: partial pressure, continuity, latent heat, ice.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "fluid/gas-private.h"
#include "gas-check.h"

#define FLUE "gas:N2=0.7,CO2=0.1,H2O=0.15,O2=0.05"

/* Definition: at the dew point the partial pressure of the water is the saturation pressure of IF97. */
static void
test_dew_point_is_saturation_of_partial_pressure (void)
{
  HlSaturation sat;
  for (double p = 0.5e5; p < 5e6; p *= 1.7)
    {
      g_assert_cmpint (hl_fluid_saturation_p (hl_fluid_water (), 0.15 * p, &sat), ==, HL_OK);
      g_assert_cmpfloat_with_epsilon (hl_gas_water_dew_point (gas_of (FLUE), p), sat.T, 1e-9);
    }
  g_assert_true (isnan (hl_gas_water_dew_point (gas_of ("air"), 1e5)));
  g_assert_true (isnan (hl_gas_water_dew_point (gas_of (FLUE), 1e3)));         /* 150 Pa of water: ice comes first */
  g_assert_true (isnan (hl_gas_water_dew_point (gas_of (FLUE), 20e6)));
}

/* All functions go on through the dew point; below it h has the steeper slope of condensation. */
static void
test_states_go_on_through_the_dew_point (void)
{
  static const double pressures[] = { 0.3e5, 1.01325e5, 8e5, 60e5 };
  for (gsize i = 0; i < G_N_ELEMENTS (pressures); i++)
    {
      const HlFluid *gas = gas_of (FLUE);
      double p = pressures[i], dew = hl_gas_water_dew_point (gas, p);
      HlState above, below;
      g_assert_cmpint (hl_fluid_state_pT (gas, p, dew * (1.0 + 1e-9), &above), ==, HL_OK);
      g_assert_cmpint (hl_fluid_state_pT (gas, p, dew * (1.0 - 1e-9), &below), ==, HL_OK);
      g_assert_cmpint (above.phase, ==, HL_PHASE_GAS);
      g_assert_cmpint (below.phase, ==, HL_PHASE_TWO_PHASE);
      g_assert_cmpfloat_with_epsilon (above.h, below.h, 0.02);
      g_assert_cmpfloat_with_epsilon (above.s, below.s, 1e-4);
      g_assert_cmpfloat_with_epsilon (above.v / below.v, 1.0, 1e-7);
      g_assert_cmpfloat (1.0 / below.T_h, >, 2.0 / above.T_h);
      g_assert_cmpfloat_with_epsilon (below.x, 1.0, 1e-7);
      g_assert_cmpfloat (below.x, <, 1.0);
    }
}

/* Balance of water: what is no longer vapour at psat(T) is liquid; heat of the whole against the pieces from IF97. */
static void
test_condensing_balances (void)
{
  const HlFluid *gas = gas_of (FLUE), *dry = gas_of ("gas:N2=0.7,CO2=0.1,O2=0.05");
  double p = 1e5, T = 303.15, y_w = 0.15, M_w = 18.01528e-3;
  HlFluidLimits limits, of_dry;
  HlState hot, cold, dry_hot, dry_cold;
  HlSaturation sat;
  hl_fluid_limits (gas, &limits);
  hl_fluid_limits (dry, &of_dry);
  g_assert_cmpint (hl_fluid_saturation_T (hl_fluid_water (), T, &sat), ==, HL_OK);
  g_assert_cmpint (hl_fluid_state_pT (gas, p, 423.15, &hot), ==, HL_OK);
  g_assert_cmpint (hl_fluid_state_pT (gas, p, T, &cold), ==, HL_OK);
  g_assert_cmpint (hl_fluid_state_pT (dry, p, 423.15, &dry_hot), ==, HL_OK);
  g_assert_cmpint (hl_fluid_state_pT (dry, p, T, &dry_cold), ==, HL_OK);
  double vapour = (1.0 - y_w) * sat.p / (p - sat.p), liquid = y_w - vapour;     /* moles per mole of gas */
  g_assert_cmpfloat_with_epsilon (1.0 - cold.x, liquid * M_w / limits.molar_mass, 1e-6);
  /* Heat: dry part cools, water cools as low-pressure steam (IF97 at 1 kPa), then condenses at 30 degC. */
  HlState steam_hot, steam_cold;
  g_assert_cmpint (hl_fluid_state_pT (hl_fluid_water (), 1e3, 423.15, &steam_hot), ==, HL_OK);
  g_assert_cmpint (hl_fluid_state_pT (hl_fluid_water (), 1e3, T, &steam_cold), ==, HL_OK);
  double heat = (1.0 - y_w) * of_dry.molar_mass * (dry_hot.h - dry_cold.h) + y_w * M_w * (steam_hot.h - steam_cold.h)
                + liquid * M_w * (sat.h_vapour - sat.h_liquid);
  g_assert_cmpfloat_with_epsilon ((hot.h - cold.h) * limits.molar_mass / heat, 1.0, 1e-3);
}

/* Water between the phases as the model has it: almost all of 1 kg condensed and not at all. */
static double
of_water (const char *kind, const char *subject G_GNUC_UNUSED, const char *at)
{
  const HlFluid *gas = gas_of ("gas:N2=0.05,H2O=0.95"), *nitrogen = gas_of ("gas:N2=1");
  const HlGasData *data = hl_gas_data ();
  const HlGasPolynomial *steam = &data->species[data->water].molar;
  double T = g_ascii_strtod (at, NULL), p = 1e5, M_w = 18.01528e-3, M_n = 28.01348e-3;
  HlFluidLimits limits;
  HlState wet, dry, saturated;
  if (strcmp (kind, "p_ice") == 0)
    return hl_gas_ice_pressure (T);
  hl_fluid_limits (gas, &limits);
  g_assert_cmpint (hl_fluid_state_Tx (hl_fluid_water (), T, 0.0, &saturated), ==, HL_OK);
  double ps = saturated.p, n_w = 0.95 / limits.molar_mass, n_n = 0.05 / limits.molar_mass;
  g_assert_cmpint (hl_fluid_state_pT (gas, p, T, &wet), ==, HL_OK);
  g_assert_cmpint (hl_fluid_state_pT (nitrogen, p - ps, T, &dry), ==, HL_OK);
  double n_v = n_n * ps / (p - ps), n_l = n_w - n_v;
  double h_v = data->R * hl_gas_h (steam, T), s_v = data->R * (hl_gas_s (steam, T, log (T)) - log (ps / 1e5));
  double h_l = (wet.h - n_n * M_n * dry.h - n_v * h_v) / n_l, s_l = (wet.s - n_n * M_n * dry.s - n_v * s_v) / n_l;
  return strcmp (kind, "latent") == 0 ? (h_v - h_l) / M_w / 1e3 : s_l;
}

static void
test_liquid_and_ice_agree_with_published_values (void)
{
  static const char *const kinds[] = { "latent", "s_liquid", "p_ice" };
  for (gsize i = 0; i < G_N_ELEMENTS (kinds); i++)
    check_published (kinds[i], of_water);
}

/* Second law, with its known flaw: vapour at psat(T) and liquid are in equilibrium but for the departure of steam from the
 * ideal gas, so ds = (dh - v dp)/T holds to that: 0.1 % of the heat at 60 degC, 1 % at 100 degC. */
static void
test_entropy_follows_heat_nearly (void)
{
  static const struct { double p, T, within; } rows[] = { { 1e5, 288.15, 1e-3 }, { 1e5, 318.15, 2e-3 }, { 10e5, 363.15, 8e-3 } };
  for (gsize i = 0; i < G_N_ELEMENTS (rows); i++)
    {
      HlState at;
      g_assert_cmpint (hl_fluid_state_pT (gas_of (FLUE), rows[i].p, rows[i].T, &at), ==, HL_OK);
      g_assert_cmpint (at.phase, ==, HL_PHASE_TWO_PHASE);
      g_assert_cmpfloat_with_epsilon (at.s_h * at.T, 1.0, rows[i].within);
    }
}

static void
test_ice_is_refused (void)
{
  const HlFluid *gas = gas_of (FLUE);
  HlState state;
  g_assert_cmpint (hl_fluid_state_pT (gas, 1e5, 272.0, &state), ==, HL_OUTSIDE_RANGE);
  g_autofree char *why = hl_fluid_explain_failure (gas, HL_OUTSIDE_RANGE, "pT", 1e5, 272.0);
  g_assert_cmpstr (why, ==, "at 1 bar the water in the gas (0.15 of its moles) would freeze out; ice is not computed");
  /* Dry enough it is still all gas there. */
  g_assert_cmpint (hl_fluid_state_pT (gas_of ("gas:N2=0.998,H2O=0.002"), 1e5, 272.0, &state), ==, HL_OK);
  g_assert_cmpint (state.phase, ==, HL_PHASE_GAS);
}

int
main (int argc, char *argv[])
{
  g_test_init (&argc, &argv, NULL);
  g_test_add_func ("/fluid/gas-wet/dew-point", test_dew_point_is_saturation_of_partial_pressure);
  g_test_add_func ("/fluid/gas-wet/continuity", test_states_go_on_through_the_dew_point);
  g_test_add_func ("/fluid/gas-wet/balance", test_condensing_balances);
  g_test_add_func ("/fluid/gas-wet/published", test_liquid_and_ice_agree_with_published_values);
  g_test_add_func ("/fluid/gas-wet/second-law", test_entropy_follows_heat_nearly);
  g_test_add_func ("/fluid/gas-wet/ice", test_ice_is_refused);
  return g_test_run ();
}
