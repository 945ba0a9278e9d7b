/* A liquid without a state there says which limit was broken.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "gas-check.h"

static void
test_every_limit_is_named (void)
{
  static const struct { const char *pair; double a, b; const char *says; } rows[] = {
    { "pT", 1e8, 300.0, "1000 bar lies outside of 0 to 40 bar, the pressures of mineral-oil" },
    { "pT", 1e5, 200.0, "200 K is below 273.15 K, the lowest temperature of mineral-oil" },
    { "pT", 1e5, 700.0, "700 K is above 593.15 K, the highest temperature of mineral-oil" },
    { "ph", 1e5, -1e6, "-1000 kJ/kg at 1 bar is below" },
    { "ph", 1e5, 1e7, "10000 kJ/kg at 1 bar is above" },
    { "ps", 1e5, NAN, "nan kJ/(kg K) is no entropy" },
    { "px", 1e5, 0.5, "mineral-oil is a liquid without vapour; give pressure and temperature, or pressure and enthalpy" },
    { "Tx", 300.0, 0.5, "mineral-oil is a liquid without vapour; give pressure and temperature, or pressure and enthalpy" },
    { "dT", 850.0, 300.0, "the density of mineral-oil depends on temperature alone, so density and temperature leave its pressure open" },
    { "hs", 1e7, 0.0, "10000 kJ/kg with 0 kJ/(kg K) lies outside the pressures (to 40 bar) and temperatures (273.15 K to 593.15 K) of mineral-oil" },
  };
  const HlFluid *oil = gas_of ("mineral-oil");
  for (gsize i = 0; i < G_N_ELEMENTS (rows); i++)
    {
      HlState state;
      const char *pair = rows[i].pair;
      HlStatus (*call) (const HlFluid *, double, double, HlState *) = strcmp (pair, "pT") == 0 ? hl_fluid_state_pT
        : strcmp (pair, "ph") == 0 ? hl_fluid_state_ph : strcmp (pair, "ps") == 0 ? hl_fluid_state_ps : strcmp (pair, "hs") == 0 ? hl_fluid_state_hs
        : strcmp (pair, "px") == 0 ? hl_fluid_state_px : strcmp (pair, "Tx") == 0 ? hl_fluid_state_Tx : hl_fluid_state_dT;
      g_assert_cmpint (call (oil, rows[i].a, rows[i].b, &state), ==, HL_OUTSIDE_RANGE);
      g_autofree char *why = hl_fluid_explain_failure (oil, HL_OUTSIDE_RANGE, pair, rows[i].a, rows[i].b);
      if (!g_str_has_prefix (why, rows[i].says))
        g_error ("got \"%s\", expected \"%s\"", why, rows[i].says);
    }
}

static void
test_saturation_fails (void)
{
  HlSaturation sat;
  g_assert_cmpint (hl_fluid_saturation_p (gas_of ("mineral-oil"), 1e5, &sat), ==, HL_OUTSIDE_RANGE);
  g_assert_cmpint (hl_fluid_saturation_T (gas_of ("mineral-oil"), 320.0, &sat), ==, HL_OUTSIDE_RANGE);
}

int
main (int argc, char *argv[])
{
  g_test_init (&argc, &argv, NULL);
  g_test_add_func ("/fluid/liquid-explain/limits", test_every_limit_is_named);
  g_test_add_func ("/fluid/liquid-explain/saturation", test_saturation_fails);
  return g_test_run ();
}
