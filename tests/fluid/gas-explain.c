/* A gas without a state there says which limit was broken.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "gas-check.h"

static void
test_every_limit_is_named (void)
{
  static const struct { const char *id, *pair; double a, b; const char *says; } rows[] = {
    { "air", "pT", -1.0, 300.0, "-1e-05 bar is no absolute pressure; it must lie above 0 and at most at 100 bar" },
    { "air", "pT", 2e7, 300.0, "200 bar is above 100 bar, to which a gas is computed as ideal" },
    { "air", "pT", 1e5, 150.0, "150 K is below 200 K, the lowest temperature of the polynomials of this gas" },
    { "air", "pT", 1e5, 7000.0, "7000 K is above 6000 K, the highest temperature of the polynomials of this gas" },
    { "gas:SO2=1", "pT", 1e5, 240.0, "240 K is below 250 K, the lowest temperature of the polynomials of this gas" },
    { "air", "ph", 1e5, 1e8, "100000 kJ/kg at 1 bar is above 7215.85 kJ/kg, the enthalpy at 6000 K, the highest temperature of the polynomials of this gas" },
    { "air", "ph", 1e5, -2e5, "-200 kJ/kg at 1 bar lies below 200 K, the lowest temperature of the polynomials of this gas" },
    { "air", "ps", 1e5, NAN, "nan kJ/(kg K) is no entropy" },
    { "air", "px", 1e5, 0.5, "a gas has no saturation; give pressure and temperature, or pressure and enthalpy" },
    { "flue-gas", "Tx", 330.0, 0.5,
      "a gas has no boiling pressure: its water condenses over a range of temperatures below the dew point; give pressure and temperature, or pressure and enthalpy" },
    { "air", "dT", -1.0, 300.0, "-1 kg/m3 is no density; it must lie above 0" },
    { "air", "dT", 1e4, 300.0, "8611.66 bar is above 100 bar, to which a gas is computed as ideal" },
    { "air", "hs", 1e8, 0.0, "100000 kJ/kg with 0 kJ/(kg K) lies outside the pressures (to 100 bar) and temperatures (200 K to 6000 K) of this gas" },
  };
  for (gsize i = 0; i < G_N_ELEMENTS (rows); i++)
    {
      const HlFluid *gas = gas_of (rows[i].id);
      HlState state;
      const char *pair = rows[i].pair;
      HlStatus (*call) (const HlFluid *, double, double, HlState *) = strcmp (pair, "pT") == 0 ? hl_fluid_state_pT
        : strcmp (pair, "ph") == 0 ? hl_fluid_state_ph : strcmp (pair, "ps") == 0 ? hl_fluid_state_ps : strcmp (pair, "hs") == 0 ? hl_fluid_state_hs
        : strcmp (pair, "px") == 0 ? hl_fluid_state_px : strcmp (pair, "Tx") == 0 ? hl_fluid_state_Tx : hl_fluid_state_dT;
      g_assert_cmpint (call (gas, rows[i].a, rows[i].b, &state), ==, HL_OUTSIDE_RANGE);
      g_autofree char *why = hl_fluid_explain_failure (gas, HL_OUTSIDE_RANGE, pair, rows[i].a, rows[i].b);
      g_assert_cmpstr (why, ==, rows[i].says);
    }
}

static void
test_saturation_fails (void)
{
  HlSaturation sat;
  g_assert_cmpint (hl_fluid_saturation_p (gas_of ("flue-gas"), 1e5, &sat), ==, HL_OUTSIDE_RANGE);
  g_assert_cmpint (hl_fluid_saturation_T (gas_of ("flue-gas"), 320.0, &sat), ==, HL_OUTSIDE_RANGE);
  g_autofree char *why = hl_fluid_explain_failure (gas_of ("air"), HL_NOT_CONVERGED, "ph", 1.0, 2.0);
  g_assert_cmpstr (why, ==, "ph = (1, 2): the iteration did not converge");
}

int
main (int argc, char *argv[])
{
  g_test_init (&argc, &argv, NULL);
  g_test_add_func ("/fluid/gas-explain/limits", test_every_limit_is_named);
  g_test_add_func ("/fluid/gas-explain/saturation", test_saturation_fails);
  return g_test_run ();
}
