/* What a refused call for a medium by coefficients is told: the limit by its number.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "fluid/helmholtz-private.h"
#include "media.h"

static HlStatus
call (const HlFluid *fluid, const char *pair, double a, double b, HlState *state)
{
  switch (pair[0] * 256 + pair[1])
    {
    case 'p' * 256 + 'T': return hl_fluid_state_pT (fluid, a, b, state);
    case 'p' * 256 + 'h': return hl_fluid_state_ph (fluid, a, b, state);
    case 'p' * 256 + 's': return hl_fluid_state_ps (fluid, a, b, state);
    case 'h' * 256 + 's': return hl_fluid_state_hs (fluid, a, b, state);
    case 'p' * 256 + 'x': return hl_fluid_state_px (fluid, a, b, state);
    case 'T' * 256 + 'x': return hl_fluid_state_Tx (fluid, a, b, state);
    default: return hl_fluid_state_dT (fluid, a, b, state);
    }
}

static void
test_refusals_name_the_limit (void)
{
  static const struct { const char *pair; double a, b; const char *words; } rows[] = {
    { "pT", 2e9, 400.0, "20000 bar is above 10000 bar, the highest pressure of Lemmon and Span (2006)" },
    { "pT", 0.0, 400.0, "0 bar is no absolute pressure" },
    { "pT", NAN, 400.0, "is no absolute pressure" },
    { "pT", 1e5, 100.0, "100 K is below 112.65 K, the lowest temperature of Lemmon and Span (2006)" },
    { "pT", 1e5, 501.0, "501 K is above 500 K, the highest temperature" },
    { "ph", 1e5, 5e6, "5000 kJ/kg at 1 bar is above " },
    { "ph", 1e5, -5e6, "-5000 kJ/kg at 1 bar is below " },
    { "ph", 5e6, 5e6, "the enthalpy at 500 K, the highest temperature" },
    { "ph", 1e5, NAN, "is no enthalpy" },
    { "ps", 1e5, 1e5, "100 kJ/(kg K) at 1 bar is above " },
    { "ps", 1e5, -1e5, "the entropy at 112.65 K, the lowest temperature" },
    { "hs", 1.4e6, -3e3, "needs more than 10000 bar" },
    { "hs", 1e5, 1e5, "lies outside the pressures (to 10000 bar) and temperatures (112.65 K to 500 K)" },
    { "hs", NAN, 1e3, "are no pair of enthalpy and entropy" },
    { "px", 4e6, 0.5, "40 bar is above 33.7822 bar, the critical pressure: there is no saturation" },
    { "px", 1e-6, 0.5, "where the saturation line of Lemmon and Span (2006) begins" },
    { "px", 1e5, 1.5, "1.5 is no vapour mass fraction" },
    { "Tx", 470.0, 0.5, "470 K is above 460.35 K, the critical temperature: there is no saturation" },
    { "Tx", 100.0, 0.5, "100 K is below 112.65 K" },
    { "Tx", 300.0, -0.1, "-0.1 is no vapour mass fraction" },
    { "dT", 1500.0, 400.0, "the highest pressure of Lemmon and Span (2006)" },
    { "dT", -1.0, 400.0, "-1 kg/m3 is no density" },
    { "dT", 500.0, 600.0, "600 K is above 500 K" },
  };
  const HlFluid *fluid = hl_fluid_lookup ("isopentane");
  for (gsize i = 0; i < G_N_ELEMENTS (rows); i++)
    {
      HlState state = { .p = -1.0 };
      HlStatus status = call (fluid, rows[i].pair, rows[i].a, rows[i].b, &state);
      g_autofree char *text = hl_fluid_explain_failure (fluid, status, rows[i].pair, rows[i].a, rows[i].b);
      if (status != HL_OUTSIDE_RANGE || strstr (text, rows[i].words) == NULL)
        g_error ("(%s) = (%g, %g): status %d, \"%s\" does not say \"%s\"", rows[i].pair, rows[i].a, rows[i].b, status, text, rows[i].words);
      g_assert_cmpfloat (state.p, ==, -1.0);      /* untouched */
    }
}

/* Just inside the edges of the range every medium answers, just outside it refuses. */
static void
test_edges_of_the_range (void)
{
  g_auto (GStrv) ids = all_media ();
  for (guint i = 0; ids[i] != NULL; i++)
    {
      const HlFluid *fluid = hl_fluid_lookup (ids[i]);
      HlFluidLimits limits;
      HlState state, back;
      hl_fluid_limits (fluid, &limits);
      g_assert_cmpint (hl_fluid_state_pT (fluid, 1.001 * limits.p_max, limits.T_max, &state), ==, HL_OUTSIDE_RANGE);
      g_assert_cmpint (hl_fluid_state_pT (fluid, 1e5, 1.001 * limits.T_max, &state), ==, HL_OUTSIDE_RANGE);
      g_assert_cmpint (hl_fluid_state_pT (fluid, 1e5, 0.999 * limits.T_min, &state), ==, HL_OUTSIDE_RANGE);
      double temperatures[] = { limits.T_min, limits.T_max };
      for (gsize k = 0; k < G_N_ELEMENTS (temperatures); k++)
        {
          double T = temperatures[k], p = 0.5 * limits.p_critical;
          g_assert_cmpint (hl_fluid_state_pT (fluid, p, T, &state), ==, HL_OK);
          g_assert_cmpint (hl_fluid_state_ph (fluid, p, state.h, &back), ==, HL_OK);
          assert_near (fluid, "T", p, T, back.T, T, 1e-10, 0.0);
          double out = (k == 0 ? -1e-6 : 1e-6) * state.cp * T;
          g_assert_cmpint (hl_fluid_state_ph (fluid, p, state.h + out, &back), ==, HL_OUTSIDE_RANGE);
          g_assert_cmpint (hl_fluid_state_ps (fluid, p, state.s + out / T, &back), ==, HL_OUTSIDE_RANGE);
        }
    }
}

int
main (int argc, char *argv[])
{
  g_test_init (&argc, &argv, NULL);
  g_test_add_func ("/fluid/helmholtz-explain/limits", test_refusals_name_the_limit);
  g_test_add_func ("/fluid/helmholtz-explain/edges", test_edges_of_the_range);
  return g_test_run ();
}
