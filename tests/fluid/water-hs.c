/* Water and steam from (h,s): round trips through all regions and the mixture, borders, limits.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "water-random.h"

#define CLOSE 1e-9

static HlStatus
state_hs (double h, double s, HlState *state)
{
  return hl_fluid_state_hs (hl_fluid_water (), h, s, state);
}

static void
assert_close (const char *what, const HlState *at, double value, double expected, double relative, double floor)
{
  if (!(fabs (value - expected) <= relative * fabs (expected) + floor))
    g_error ("%s at p = %.10g Pa, T = %.10g K, x = %g: got %.15g, expected %.15g", what, at->p, at->T, at->x, value, expected);
}

static void
assert_same_pTs (const HlState *got, const HlState *expected)
{
  /* In cold liquid p follows from s with the slope -v/T: one rounding of s
   * and h (2e-16 of some 1000 J/(kg K) and 4e5 J/kg) is 1e-7 Pa or more, and a
   * handful of them meet. */
  assert_close ("p", expected, got->p, expected->p, CLOSE, expected->phase == HL_PHASE_LIQUID ? 2e-6 : 0.0);
  assert_close ("T", expected, got->T, expected->T, CLOSE, 0.0);
  assert_close ("h", expected, got->h, expected->h, CLOSE, 1e-6);
  assert_close ("s", expected, got->s, expected->s, CLOSE, 1e-6);
  g_assert_cmpint (got->phase, ==, expected->phase);
}

static void
assert_same_state (const HlState *got, const HlState *expected)
{
  assert_same_pTs (got, expected);
  assert_close ("v", expected, got->v, expected->v, CLOSE, 0.0);
}

/* As for (p,h): next to a jump between regions two states share their h and s. */
static gboolean
is_near_border (double p, double T)
{
  if (fabs (T - 1073.15) < 0.2)
    return TRUE;
  return p > HL_IF97_P_SAT_13 && (fabs (T - 623.15) < 0.2 || fabs (T - hl_if97_B23_T (p)) < 0.2);
}

static void
test_round_trips_close (void)
{
  static const int regions[] = { 1, 2, 3, 5 };
  g_autoptr (GRand) rand = g_rand_new_with_seed (2014);
  for (gsize r = 0; r < G_N_ELEMENTS (regions); r++)
    for (int i = 0; i < 20000; i++)
      {
        HlState there, back;
        double p, T;
        random_state (rand, regions[r], &p, &T);
        g_assert_cmpint (hl_fluid_state_pT (hl_fluid_water (), p, T, &there), ==, HL_OK);
        if (state_hs (there.h, there.s, &back) != HL_OK)
          g_error ("no state for p = %.10g Pa, T = %.10g K", p, T);
        g_assert_cmpfloat (back.h, ==, there.h);
        if (is_near_border (p, T))
          g_assert_cmpfloat_with_epsilon (back.T, T, 0.2);
        else
          assert_same_state (&back, &there);
      }
}

static void
test_mixture_round_trips_close (void)
{
  g_autoptr (GRand) rand = g_rand_new_with_seed (29);
  for (int i = 0; i < 20000; i++)
    {
      HlState there, back;
      double p = i % 3 ? random_log (rand, 612.0, 22.06e6) : g_rand_double_range (rand, 15e6, 22.06e6);
      double x = g_rand_double_range (rand, 1e-6, 1.0 - 1e-6);
      if (fabs (p / HL_IF97_P_SAT_13 - 1.0) < 2e-3)
        continue;
      g_assert_cmpint (hl_fluid_state_px (hl_fluid_water (), p, x, &there), ==, HL_OK);
      if (state_hs (there.h, there.s, &back) != HL_OK)
        g_error ("no state for p = %.10g Pa, x = %.10g", p, x);
      /* Close to the critical point the isotherm is so flat (p_d below 100
       * J/kg) that the rounding of p3 (3e-13) moves the ends' densities by
       * 1e-9: x and v carry that, p, T, h and s do not.  x is a part of 1. */
      gboolean is_flat = p > 22.0e6;
      assert_same_pTs (&back, &there);
      assert_close ("v", &there, back.v, there.v, is_flat ? 1e-7 : CLOSE, 0.0);
      assert_close ("x", &there, back.x, there.x, 0.0, is_flat ? 1e-7 : CLOSE);
    }
}

/* Inside the jump of the mixture at 623.15 K, and of liquid there, the state
 * on the border is returned: its h is the one asked, its s the nearest. */
static void
test_boundary_state_inside_jumps (void)
{
  for (double x = 0.1; x < 1.0; x += 0.2)
    {
      HlState below, above, state;
      double p = HL_IF97_P_SAT_13;
      g_assert_cmpint (hl_fluid_state_px (hl_fluid_water (), p * (1.0 - 1e-12), x, &below), ==, HL_OK);
      g_assert_cmpint (hl_fluid_state_ph (hl_fluid_water (), p * (1.0 + 1e-9), below.h, &above), ==, HL_OK);
      double s = 0.5 * (below.s + above.s);
      g_assert_cmpint (state_hs (below.h, s, &state), ==, HL_OK);
      g_assert_cmpfloat (state.h, ==, below.h);
      g_assert_cmpfloat_with_epsilon (state.s, s, 0.2);
      g_assert_cmpfloat_with_epsilon (state.p / p, 1.0, 1e-3);
    }
}

static void
test_limits_are_inside (void)
{
  static const struct { double p, T; } rows[] = {
    { 100e6, 273.15 }, { 100e6, 500.0 }, { 100e6, 700.0 }, { 100e6, 1000.0 }, { 100e6, 1073.15 }, { 50e6, 2273.15 },
    { 50e6, 1500.0 }, { 1e3, 2273.15 }, { 1.0, 1000.0 }, { 1e5, 273.15 }, { 50e6, 273.15 }, { 100.0, 273.15 },
  };
  for (gsize i = 0; i < G_N_ELEMENTS (rows); i++)
    {
      HlState there, back;
      g_assert_cmpint (hl_fluid_state_pT (hl_fluid_water (), rows[i].p, rows[i].T, &there), ==, HL_OK);
      g_assert_cmpint (state_hs (there.h, there.s, &back), ==, HL_OK);
      g_assert_cmpfloat_with_epsilon (back.T / there.T, 1.0, CLOSE);
      g_assert_cmpfloat_with_epsilon (back.p / there.p, 1.0, 2e-9);
    }
}

static void
test_outside_the_range_fails (void)
{
  static const struct { double h, s; } rows[] = {
    { 1e6, 1000.0 },      /* needs more than 100 MPa */
    { 2e5, 9000.0 },      /* colder than 273.15 K at any pressure */
    { 8e6, 9000.0 },      /* hotter than region 5 */
    { 4.5e6, 6000.0 },    /* hotter than 1073.15 K above 50 MPa */
    { -1e5, -500.0 }, { 5e5, 20000.0 },
    { NAN, 1000.0 }, { 1e6, NAN }, { INFINITY, 1000.0 }, { 1e6, INFINITY }, { -INFINITY, -INFINITY }, { 1e300, 1e300 },
  };
  for (gsize i = 0; i < G_N_ELEMENTS (rows); i++)
    {
      HlState state = { .T = 1.5 };
      if (state_hs (rows[i].h, rows[i].s, &state) != HL_OUTSIDE_RANGE)
        g_error ("h = %g J/kg, s = %g J/(kg K) gave a state at p = %g Pa, T = %g K", rows[i].h, rows[i].s, state.p, state.T);
      g_assert_cmpfloat (state.T, ==, 1.5);
    }
}

int
main (int argc, char *argv[])
{
  g_test_init (&argc, &argv, NULL);
  g_test_add_func ("/fluid/water-hs/round-trips", test_round_trips_close);
  g_test_add_func ("/fluid/water-hs/mixture", test_mixture_round_trips_close);
  g_test_add_func ("/fluid/water-hs/jumps", test_boundary_state_inside_jumps);
  g_test_add_func ("/fluid/water-hs/limits", test_limits_are_inside);
  g_test_add_func ("/fluid/water-hs/outside", test_outside_the_range_fails);
  return g_test_run ();
}
