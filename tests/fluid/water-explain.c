/* Sentences of failed calls: the limit that was broken, its figure and the one that was asked.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "fluid/fluid.h"

#include <math.h>
#include <string.h>

typedef HlStatus (*Call) (const HlFluid *fluid, double a, double b, HlState *state);

static void
test_sentences_name_the_limit (void)
{
  static const struct { const char *pair; Call call; double a, b; const char *words[4]; } rows[] = {
    { "pT", hl_fluid_state_pT, 120e6, 300.0, { "1200 bar is above 1000 bar, the highest pressure of IAPWS-IF97" } },
    { "pT", hl_fluid_state_pT, 0.0, 300.0, { "0 bar is no absolute pressure" } },
    { "pT", hl_fluid_state_pT, NAN, 300.0, { "nan bar is no absolute pressure" } },
    { "pT", hl_fluid_state_pT, 1e5, 250.0, { "250 K is below 273.15 K, the lowest temperature" } },
    { "pT", hl_fluid_state_pT, 1e5, 3000.0, { "3000 K is above 2273.15 K, the highest temperature" } },
    { "pT", hl_fluid_state_pT, 60e6, 1500.0, { "600 bar is above 500 bar", "above 1073.15 K" } },
    { "ph", hl_fluid_state_ph, 1e5, -1e5, { "-100 kJ/kg at 1 bar is below", "273.15 K" } },
    { "ph", hl_fluid_state_ph, 1e5, 8e6, { "8000 kJ/kg at 1 bar is above", "2273.15 K" } },
    { "ph", hl_fluid_state_ph, 60e6, 6e6, { "6000 kJ/kg at 600 bar is above", "1073.15 K" } },
    { "ph", hl_fluid_state_ph, 200e6, 1e6, { "2000 bar is above 1000 bar" } },
    { "ph", hl_fluid_state_ph, 1e5, NAN, { "no enthalpy" } },
    { "ps", hl_fluid_state_ps, 1e5, -500.0, { "-0.5 kJ/(kg K) at 1 bar is below", "273.15 K" } },
    { "ps", hl_fluid_state_ps, 1e5, 2e4, { "20 kJ/(kg K) at 1 bar is above", "2273.15 K" } },
    { "hs", hl_fluid_state_hs, 1e6, 1000.0, { "1000 kJ/kg with 1 kJ/(kg K) needs more than 1000 bar" } },
    { "hs", hl_fluid_state_hs, 5e5, 9000.0, { "needs less than", "273.15 K" } },
    { "hs", hl_fluid_state_hs, 9e6, 9000.0, { "9000 kJ/kg with 9 kJ/(kg K)", "2273.15 K" } },
    { "hs", hl_fluid_state_hs, NAN, 9000.0, { "no pair of enthalpy and entropy" } },
    { "px", hl_fluid_state_px, 300.0, 0.5, { "300 Pa is below 611.213 Pa" } },
    { "px", hl_fluid_state_px, 25e6, 0.5, { "250 bar is above 220.64 bar, the critical pressure" } },
    { "px", hl_fluid_state_px, 1e5, 1.2, { "1.2 is no vapour mass fraction" } },
    { "px", hl_fluid_state_px, -1e5, 0.5, { "-1 bar is no absolute pressure" } },
    { "Tx", hl_fluid_state_Tx, 260.0, 0.5, { "260 K is below 273.15 K" } },
    { "Tx", hl_fluid_state_Tx, 650.0, 0.5, { "650 K is above 647.096 K, the critical temperature" } },
    { "Tx", hl_fluid_state_Tx, 400.0, -0.5, { "-0.5 is no vapour mass fraction" } },
  };
  for (gsize i = 0; i < G_N_ELEMENTS (rows); i++)
    {
      HlState state;
      HlStatus status = rows[i].call (hl_fluid_water (), rows[i].a, rows[i].b, &state);
      g_assert_cmpint (status, ==, HL_OUTSIDE_RANGE);
      g_autofree char *text = hl_fluid_explain_failure (hl_fluid_water (), status, rows[i].pair, rows[i].a, rows[i].b);
      for (gsize k = 0; k < G_N_ELEMENTS (rows[i].words) && rows[i].words[k] != NULL; k++)
        if (strstr (text, rows[i].words[k]) == NULL)
          g_error ("(%s) = (%g, %g): \"%s\" lacks \"%s\"", rows[i].pair, rows[i].a, rows[i].b, text, rows[i].words[k]);
    }
}

/* Where no limit is broken or the pair is unknown, the status's words remain. */
static void
test_other_failures_have_words (void)
{
  g_autofree char *a = hl_fluid_explain_failure (hl_fluid_water (), HL_NOT_CONVERGED, "ph", 1e5, 1e6);
  g_autofree char *b = hl_fluid_explain_failure (hl_fluid_water (), HL_OUTSIDE_RANGE, "pv", 1e5, 1e6);
  g_autofree char *c = hl_fluid_explain_failure (hl_fluid_water (), HL_OUTSIDE_RANGE, "pT", 1e5, 300.0);
  g_assert_nonnull (strstr (a, "did not converge"));
  g_assert_nonnull (strstr (b, "outside the published range"));
  g_assert_nonnull (strstr (c, "outside the published range"));
}

int
main (int argc, char *argv[])
{
  g_test_init (&argc, &argv, NULL);
  g_test_add_func ("/fluid/water-explain/limits", test_sentences_name_the_limit);
  g_test_add_func ("/fluid/water-explain/others", test_other_failures_have_words);
  return g_test_run ();
}
