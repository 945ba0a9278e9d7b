/* Media by coefficients from every pair: round trips on random states of each, derivatives, refusals.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "fluid/helmholtz-private.h"
#include "media.h"

#define CLOSE 1e-9
#define N_SINGLE 400
#define N_WET 150

typedef struct {
  const HlFluid *fluid;
  HlFluidLimits  limits;
  double         R;
} Case;

static Case
case_of (const char *id)
{
  Case c = { .fluid = hl_fluid_lookup (id) };
  g_assert_nonnull (c.fluid);
  hl_fluid_limits (c.fluid, &c.limits);
  c.R = 8.3145 / c.limits.molar_mass;
  return c;
}

/* What a pressure is worth: in a liquid it is a small difference of large terms,
 * so it can come back from other properties only to some 1e-9 of dp/dd times d. */
static double
pressure_floor (const HlState *state)
{
  double p_d = state->w * state->w * state->cv / state->cp;
  return isfinite (p_d) ? p_d / state->v : 0.0;
}

static void
assert_same (const Case *c, const char *pair, const HlState *got, const HlState *there)
{
  double p = there->p, T = there->T;
  assert_near (c->fluid, pair, p, T, got->p, there->p, CLOSE, pressure_floor (there));
  assert_near (c->fluid, pair, p, T, got->T, there->T, CLOSE, 0.0);
  assert_near (c->fluid, pair, p, T, got->v, there->v, CLOSE, 0.0);
  assert_near (c->fluid, pair, p, T, got->h, there->h, CLOSE, c->R * T);
  assert_near (c->fluid, pair, p, T, got->s, there->s, CLOSE, c->R);
  g_assert_cmpint (got->phase, ==, there->phase);
}

static void
assert_round_trips (const Case *c, const HlState *there)
{
  HlState back;
  g_assert_cmpint (hl_fluid_state_ph (c->fluid, there->p, there->h, &back), ==, HL_OK);
  assert_same (c, "ph", &back, there);
  g_assert_cmpint (hl_fluid_state_ps (c->fluid, there->p, there->s, &back), ==, HL_OK);
  assert_same (c, "ps", &back, there);
  g_assert_cmpint (hl_fluid_state_dT (c->fluid, 1.0 / there->v, there->T, &back), ==, HL_OK);
  assert_same (c, "dT", &back, there);
}

static void
assert_hs (const Case *c, const HlState *there)
{
  HlState back;
  g_assert_cmpint (hl_fluid_state_hs (c->fluid, there->h, there->s, &back), ==, HL_OK);
  assert_same (c, "hs", &back, there);
}

/* All of the range on a logarithmic scale of pressure, denser around the critical point. */
static void
random_pT (const Case *c, GRand *rand, int i, double *p, double *T)
{
  double low = log (fmax (c->limits.p_triple * 0.1, 1e-3)), high = log (fmin (c->limits.p_max, 60e6));
  *T = g_rand_double_range (rand, c->limits.T_min, c->limits.T_max);
  *p = exp (g_rand_double_range (rand, low, high));
  if (i % 3 == 0)
    {
      *T = fmax (c->limits.T_critical * g_rand_double_range (rand, 0.8, 1.1), c->limits.T_min);
      *T = fmin (*T, c->limits.T_max);
      *p = fmin (c->limits.p_critical * g_rand_double_range (rand, 0.2, 2.5), c->limits.p_max);
    }
}

static void
test_single_phase_round_trips_close (gconstpointer data)
{
  Case c = case_of (data);
  g_autoptr (GRand) rand = g_rand_new_with_seed (37);
  for (int i = 0; i < N_SINGLE; i++)
    {
      double p, T;
      HlState there;
      random_pT (&c, rand, i, &p, &T);
      g_assert_cmpint (hl_fluid_state_pT (c.fluid, p, T, &there), ==, HL_OK);
      assert_round_trips (&c, &there);
      if (i % 4 == 0)
        assert_hs (&c, &there);
    }
}

static void
test_wet_round_trips_close (gconstpointer data)
{
  Case c = case_of (data);
  g_autoptr (GRand) rand = g_rand_new_with_seed (73);
  for (int i = 0; i < N_WET; i++)
    {
      HlState there, back;
      double x = g_rand_double_range (rand, 0.001, 0.999);
      double T = c.limits.T_min + (c.limits.T_critical * 0.9999 - c.limits.T_min) * g_rand_double (rand);
      g_assert_cmpint (hl_fluid_state_Tx (c.fluid, T, x, &there), ==, HL_OK);
      g_assert_cmpint (hl_fluid_state_px (c.fluid, there.p, x, &back), ==, HL_OK);
      assert_same (&c, "px", &back, &there);
      assert_round_trips (&c, &there);
      if (i % 4 == 0)
        assert_hs (&c, &there);
    }
}

/* Close to the line on both sides, where a wrong branch would show. */
static void
test_both_sides_of_the_line (gconstpointer data)
{
  Case c = case_of (data);
  for (int i = 1; i < 60; i++)
    {
      double T = c.limits.T_min + (c.limits.T_critical - c.limits.T_min) * i / 60.0;
      HlSaturation sat;
      HlState state;
      g_assert_cmpint (hl_fluid_saturation_T (c.fluid, T, &sat), ==, HL_OK);
      g_assert_cmpint (hl_fluid_state_pT (c.fluid, sat.p, T, &state), ==, HL_OK);
      g_assert_cmpint (state.phase, ==, HL_PHASE_LIQUID);
      assert_near (c.fluid, "v'", sat.p, T, state.v, sat.v_liquid, 1e-8, 0.0);
      g_assert_cmpint (hl_fluid_state_pT (c.fluid, sat.p * (1.0 - 1e-9), T, &state), ==, HL_OK);
      g_assert_cmpint (state.phase, ==, HL_PHASE_VAPOUR);
      assert_near (c.fluid, "v''", sat.p, T, state.v, sat.v_vapour, 1e-6, 0.0);
      g_assert_cmpint (hl_fluid_state_ph (c.fluid, sat.p, sat.h_liquid - 1e-6 * c.R * T, &state), ==, HL_OK);
      g_assert_cmpint (state.phase, ==, HL_PHASE_LIQUID);
      g_assert_cmpint (hl_fluid_state_ph (c.fluid, sat.p, sat.h_vapour + 1e-6 * c.R * T, &state), ==, HL_OK);
      g_assert_cmpint (state.phase, ==, HL_PHASE_VAPOUR);
    }
}

/* Central differences of the calls themselves; their own error is some 1e-6, and in
 * a liquid, where T and v hardly depend on p, their rounding: 1e-13 of T or v over dp. */
static void
check_slopes (const Case *c, const HlState *there)
{
  HlState lower, upper;
  double dp = 1e-4 * there->p, dh = 1e-4 * c->R * there->T;
  if (hl_fluid_state_ph (c->fluid, there->p - dp, there->h, &lower) != HL_OK || hl_fluid_state_ph (c->fluid, there->p + dp, there->h, &upper) != HL_OK
      || lower.phase != there->phase || upper.phase != there->phase)
    return;
  assert_near (c->fluid, "T_p", there->p, there->T, there->T_p, (upper.T - lower.T) / (2.0 * dp), 2e-5, 1e-4 * there->T / there->p);
  assert_near (c->fluid, "s_p", there->p, there->T, there->s_p, (upper.s - lower.s) / (2.0 * dp), 2e-5, 0.0);
  assert_near (c->fluid, "v_p", there->p, there->T, there->v_p, (upper.v - lower.v) / (2.0 * dp), 2e-5, 1e-3 * there->v / there->p);
  if (hl_fluid_state_ph (c->fluid, there->p, there->h - dh, &lower) != HL_OK || hl_fluid_state_ph (c->fluid, there->p, there->h + dh, &upper) != HL_OK
      || lower.phase != there->phase || upper.phase != there->phase)
    return;
  assert_near (c->fluid, "T_h", there->p, there->T, there->T_h, (upper.T - lower.T) / (2.0 * dh), 2e-5, 0.0);
  assert_near (c->fluid, "s_h", there->p, there->T, there->s_h, (upper.s - lower.s) / (2.0 * dh), 2e-5, 0.0);
  assert_near (c->fluid, "v_h", there->p, there->T, there->v_h, (upper.v - lower.v) / (2.0 * dh), 2e-5, 0.0);
}

static void
check_saturation_slopes (const Case *c, double p)
{
  HlSaturation at, lower, upper;
  double dp = 1e-5 * p;
  g_assert_cmpint (hl_fluid_saturation_p (c->fluid, p, &at), ==, HL_OK);
  g_assert_cmpint (hl_fluid_saturation_p (c->fluid, p - dp, &lower), ==, HL_OK);
  g_assert_cmpint (hl_fluid_saturation_p (c->fluid, p + dp, &upper), ==, HL_OK);
  assert_near (c->fluid, "Tsat_p", p, at.T, at.T_p, (upper.T - lower.T) / (2.0 * dp), 1e-6, 0.0);
  assert_near (c->fluid, "h'_p", p, at.T, at.h_liquid_p, (upper.h_liquid - lower.h_liquid) / (2.0 * dp), 1e-6, 0.0);
  assert_near (c->fluid, "h''_p", p, at.T, at.h_vapour_p, (upper.h_vapour - lower.h_vapour) / (2.0 * dp), 1e-6, c->R * at.T / p);
  assert_near (c->fluid, "s'_p", p, at.T, at.s_liquid_p, (upper.s_liquid - lower.s_liquid) / (2.0 * dp), 1e-6, 0.0);
  assert_near (c->fluid, "s''_p", p, at.T, at.s_vapour_p, (upper.s_vapour - lower.s_vapour) / (2.0 * dp), 1e-6, c->R / p);
  assert_near (c->fluid, "v'_p", p, at.T, at.v_liquid_p, (upper.v_liquid - lower.v_liquid) / (2.0 * dp), 1e-6, 1e-3 * at.v_liquid / p);
  assert_near (c->fluid, "v''_p", p, at.T, at.v_vapour_p, (upper.v_vapour - lower.v_vapour) / (2.0 * dp), 1e-6, 0.0);
}

static void
test_slopes_agree_with_differences (gconstpointer data)
{
  Case c = case_of (data);
  g_autoptr (GRand) rand = g_rand_new_with_seed (11);
  for (int i = 0; i < 40; i++)
    {
      HlState there;
      double T = g_rand_double_range (rand, c.limits.T_min, c.limits.T_max);
      double p = c.limits.p_critical * exp (g_rand_double_range (rand, log (0.01), log (0.9 * c.limits.p_max / c.limits.p_critical)));
      g_assert_cmpint (hl_fluid_state_pT (c.fluid, p, T, &there), ==, HL_OK);
      if (fabs (p / c.limits.p_critical - 1.0) > 0.1)
        check_slopes (&c, &there);
      p = c.limits.p_critical * g_rand_double_range (rand, 0.05, 0.9);
      if (p < 1.01 * c.limits.p_triple)
        continue;
      check_saturation_slopes (&c, p);
      g_assert_cmpint (hl_fluid_state_px (c.fluid, p, 0.5, &there), ==, HL_OK);
      check_slopes (&c, &there);
    }
}

int
main (int argc, char *argv[])
{
  static const struct { const char *name; GTestDataFunc test; } tests[] = {
    { "single-phase", test_single_phase_round_trips_close }, { "wet", test_wet_round_trips_close },
    { "both-sides", test_both_sides_of_the_line }, { "slopes", test_slopes_agree_with_differences },
  };
  g_test_init (&argc, &argv, NULL);
  g_auto (GStrv) ids = all_media ();
  for (guint i = 0; ids[i] != NULL; i++)
    for (gsize k = 0; k < G_N_ELEMENTS (tests); k++)
      {
        g_autofree char *path = g_strdup_printf ("/fluid/helmholtz-inverse/%s/%s", tests[k].name, ids[i]);
        g_test_add_data_func (path, ids[i], tests[k].test);
      }
  return g_test_run ();
}
