/* Every pair leads back to the state it was taken from; where two states answer, or none, it says so.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "batch/state-pair.h"

#include <math.h>
#include <string.h>

static double
quantity (const HlState *state, HlStateKey key)
{
  const double values[HL_N_STATE_KEYS] = { state->p, state->T, state->h, state->s, 1.0 / state->v, state->x };
  return values[key];
}

/* States of every kind: compressed water, wet steam, steam, supercritical, and region 5 of IAPWS-IF97. */
static const struct { double p, T, x; } places[] = {
  { 5e5, 320.0, NAN }, { 8e6, 500.0, NAN }, { NAN, 450.0, 0.4 }, { NAN, 600.0, 0.9 }, { NAN, 311.0, 0.05 },
  { 8e6, 753.15, NAN }, { 1e4, 400.0, NAN }, { 25e6, 700.0, NAN }, { 30e6, 900.0, NAN }, { 1e6, 1500.0, NAN },
};

static void
place_state (guint n, HlState *state)
{
  HlStatus status = isfinite (places[n].x) ? hl_fluid_state_Tx (hl_fluid_water (), places[n].T, places[n].x, state)
                                           : hl_fluid_state_pT (hl_fluid_water (), places[n].p, places[n].T, state);
  g_assert_cmpint (status, ==, HL_OK);
}

static void
assert_same (double a, double b, double relative)
{
  if (!(fabs (a - b) <= relative * fabs (b)))
    g_error ("%.12g is not %.12g", a, b);
}

static void
test_every_pair_leads_back (void)
{
  guint n_found = 0, n_ambiguous = 0;
  for (guint n = 0; n < G_N_ELEMENTS (places); n++)
    for (HlStateKey first = 0; first < HL_N_STATE_KEYS; first++)
      for (HlStateKey second = 0; second < HL_N_STATE_KEYS; second++)
        {
          HlState from, to;
          g_autofree char *message = NULL;
          place_state (n, &from);
          gboolean is_wet = isfinite (from.x);
          double a = quantity (&from, first), b = quantity (&from, second);
          /* x says nothing where there is one phase, and p and T are one where there are two. */
          if (first == second || (!is_wet && (first == HL_STATE_X || second == HL_STATE_X))
              || (is_wet && MAX (first, second) == HL_STATE_T))
            continue;
          /* No search moves along h, s or density. */
          if ((first == HL_STATE_RHO && (second == HL_STATE_H || second == HL_STATE_S))
              || (second == HL_STATE_RHO && (first == HL_STATE_H || first == HL_STATE_S)))
            continue;
          gboolean is_found = hl_state_from_pair (hl_fluid_water (), first, a, second, b, &to, &message);
          if (!is_found && strstr (message, "more than one state") != NULL)
            {
              n_ambiguous++;     /* its own test below */
              continue;
            }
          n_found++;
          if (!is_found)
            g_error ("place %u, keys %d %d: %s", n, (int) first, (int) second, message);
          assert_same (to.p, from.p, 2e-6);
          assert_same (to.T, from.T, 1e-8);
          assert_same (1.0 / to.v, 1.0 / from.v, 1e-7);
          g_assert_cmpfloat_with_epsilon (to.h, from.h, 0.05);
          g_assert_cmpfloat_with_epsilon (quantity (&to, first), a, 1e-9 * fabs (a));
          g_assert_cmpfloat_with_epsilon (quantity (&to, second), b, 1e-9 * fabs (b));
        }
  g_test_message ("%u pairs lead back, %u have two answers", n_found, n_ambiguous);
  g_assert_cmpuint (n_found, >, 10 * n_ambiguous);
}

static void
assert_refused (HlStateKey first, double a, HlStateKey second, double b, const char *expected)
{
  HlState state = { .p = 1.0 };
  g_autofree char *message = NULL;
  g_assert_false (hl_state_from_pair (hl_fluid_water (), first, a, second, b, &state, &message));
  g_assert_cmpfloat (state.p, ==, 1.0);
  if (message == NULL || strstr (message, expected) == NULL)
    g_error ("“%s” does not hold “%s”", message, expected);
}

static void
test_two_answers_are_not_chosen_from (void)
{
  /* Saturated steam of 2750 kJ/kg exists near 5.2 bar and near 86 bar: its enthalpy is highest between (IAPWS-IF97
   * saturation table). */
  assert_refused (HL_STATE_X, 1.0, HL_STATE_H, 2.75e6, "more than one state");
  /* Water of 999.9 kg/m3 at 1 bar exists on both sides of the density maximum at 4 °C. */
  assert_refused (HL_STATE_P, 1e5, HL_STATE_RHO, 999.9, "more than one state");
}

static void
test_no_answer_says_why (void)
{
  /* Denser than water is anywhere at 1 bar. */
  assert_refused (HL_STATE_P, 1e5, HL_STATE_RHO, 1000.5, "no state");
  assert_refused (HL_STATE_T, 5000.0, HL_STATE_RHO, 1.0, "no state");
  assert_refused (HL_STATE_T, 300.0, HL_STATE_RHO, -1.0, "above 0");
  assert_refused (HL_STATE_T, 300.0, HL_STATE_RHO, NAN, "above 0");
  assert_refused (HL_STATE_P, 1200e5, HL_STATE_T, 600.0, "1200 bar");
  assert_refused (HL_STATE_H, 2e6, HL_STATE_RHO, 1.0, "take p, T or x");
}

static void
test_near_the_density_maximum_both_sides_are_seen (void)
{
  /* At 273.3 K and 999.86 kg/m3 the second answer lies within the first step of the search. */
  assert_refused (HL_STATE_P, 1e5, HL_STATE_RHO, 999.86, "more than one state");
}

int
main (int argc, char **argv)
{
  g_test_init (&argc, &argv, NULL);
  g_test_add_func ("/state-pair/every-pair-leads-back", test_every_pair_leads_back);
  g_test_add_func ("/state-pair/two-answers-are-not-chosen-from", test_two_answers_are_not_chosen_from);
  g_test_add_func ("/state-pair/no-answer-says-why", test_no_answer_says_why);
  g_test_add_func ("/state-pair/near-the-density-maximum-both-sides-are-seen", test_near_the_density_maximum_both_sides_are_seen);
  return g_test_run ();
}
