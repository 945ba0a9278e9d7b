/* Water and steam from (p,h) and (p,s): round trips, derivatives, borders, the mixture.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "fluid/water-edges.h"
#include "water-random.h"

#define CLOSE 1e-9       /* relative: what every round trip must close to */
#define CLOSE_SLOPE 1e-8 /* relative: cp, cv, w and derivatives after a step to second order */

static const int single_phase[] = { 1, 2, 3, 5 };

static HlStatus
state_ph (double p, double h, HlState *state)
{
  return hl_fluid_state_ph (hl_fluid_water (), p, h, state);
}

static HlStatus
state_ps (double p, double s, HlState *state)
{
  return hl_fluid_state_ps (hl_fluid_water (), p, s, state);
}

static void
assert_close (const char *what, const HlState *at, double value, double expected, double relative, double floor)
{
  if (!(fabs (value - expected) <= relative * fabs (expected) + floor))
    g_error ("%s at p = %.10g Pa, T = %.10g K: got %.15g, expected %.15g", what, at->p, at->T, value, expected);
}

/* h and s pass through zero near 273.16 K; their floors are 1e-9 of 1 kJ/kg and of 1 kJ/(kg K). */
static void
assert_same_state (const HlState *got, const HlState *expected)
{
  assert_close ("p", expected, got->p, expected->p, CLOSE, 0.0);
  assert_close ("T", expected, got->T, expected->T, CLOSE, 0.0);
  assert_close ("h", expected, got->h, expected->h, CLOSE, 1e-6);
  assert_close ("s", expected, got->s, expected->s, CLOSE, 1e-6);
  assert_close ("v", expected, got->v, expected->v, CLOSE, 0.0);
  assert_close ("u", expected, got->u, expected->u, CLOSE, 1e-6);
  g_assert_cmpint (got->phase, ==, expected->phase);
}

static void
assert_same_slopes (const HlState *got, const HlState *expected)
{
  assert_close ("cp", expected, got->cp, expected->cp, CLOSE_SLOPE, 0.0);
  assert_close ("cv", expected, got->cv, expected->cv, CLOSE_SLOPE, 0.0);
  assert_close ("w", expected, got->w, expected->w, CLOSE_SLOPE, 0.0);
  assert_close ("v_p", expected, got->v_p, expected->v_p, CLOSE_SLOPE, 0.0);
  assert_close ("T_h", expected, got->T_h, expected->T_h, CLOSE_SLOPE, 0.0);
}

/* Within this distance of a border the jump there can make two states share
 * one h or s (its size in K is at most 0.06 K by the equations), and a round
 * trip may come back on the other side. */
static gboolean
is_near_border (double p, double T)
{
  if (fabs (T - 1073.15) < 0.1)
    return TRUE;
  return p > HL_IF97_P_SAT_13 && (fabs (T - 623.15) < 0.1 || fabs (T - hl_if97_B23_T (p)) < 0.1);
}

static void
test_round_trips_close (void)
{
  g_autoptr (GRand) rand = g_rand_new_with_seed (1997);
  for (gsize r = 0; r < G_N_ELEMENTS (single_phase); r++)
    for (int i = 0; i < 20000; i++)
      {
        HlState there, by_h, by_s;
        double p, T;
        random_state (rand, single_phase[r], &p, &T);
        g_assert_cmpint (hl_fluid_state_pT (hl_fluid_water (), p, T, &there), ==, HL_OK);
        g_assert_cmpint (state_ph (p, there.h, &by_h), ==, HL_OK);
        g_assert_cmpint (state_ps (p, there.s, &by_s), ==, HL_OK);
        g_assert_cmpfloat (by_h.h, ==, there.h);
        g_assert_cmpfloat (by_s.s, ==, there.s);
        if (is_near_border (p, T))
          {
            g_assert_cmpfloat_with_epsilon (by_h.T, T, 0.1);
            g_assert_cmpfloat_with_epsilon (by_s.T, T, 0.1);
            continue;
          }
        assert_same_state (&by_h, &there);
        assert_same_state (&by_s, &there);
        assert_same_slopes (&by_h, &there);
        assert_same_slopes (&by_s, &there);
      }
}

/* Along every isobar from the coldest to the hottest state, also through the
 * borders: an answer always has the h that was asked, and T rises with it. */
static void
test_isobars_are_whole (void)
{
  for (double p = 1.0; p <= HL_IF97_P_MAX; p *= 1.17)
    {
      HlState cold, hot, state;
      double T_before = 0.0;
      double T_max = p > HL_IF97_P_MAX_5 ? HL_IF97_T_25 : HL_IF97_T_MAX;
      g_assert_cmpint (hl_fluid_state_pT (hl_fluid_water (), p, HL_IF97_T_MIN, &cold), ==, HL_OK);
      g_assert_cmpint (hl_fluid_state_pT (hl_fluid_water (), p, T_max, &hot), ==, HL_OK);
      for (int i = 0; i <= 3000; i++)
        {
          double h = cold.h + (hot.h - cold.h) * i / 3000.0;
          g_assert_cmpint (state_ph (p, h, &state), ==, HL_OK);
          g_assert_cmpfloat (state.h, ==, h);
          g_assert_cmpfloat (state.T, >=, T_before * (1.0 - 1e-12));
          T_before = state.T;
        }
      for (int i = 0; i <= 1000; i++)
        {
          double s = cold.s + (hot.s - cold.s) * i / 1000.0;
          g_assert_cmpint (state_ps (p, s, &state), ==, HL_OK);
          g_assert_cmpfloat (state.s, ==, s);
        }
    }
}

static void
assert_mixture (const HlState *got, const HlState *expected)
{
  assert_same_state (got, expected);
  assert_close ("x", expected, got->x, expected->x, CLOSE, 1e-11);
  g_assert_true (isnan (got->cp) && isnan (got->cv) && isnan (got->w));
}

/* Around the critical point, where cp has no bound, both in a wide and in a
 * very narrow neighbourhood. */
static void
test_round_trips_close_near_the_critical_point (void)
{
  g_autoptr (GRand) rand = g_rand_new_with_seed (22064);
  for (int i = 0; i < 20000; i++)
    {
      HlState there, back;
      double width = i % 2 ? 1.0 : 0.01;
      double p = HL_IF97_P_CRITICAL + g_rand_double_range (rand, -1e6, 1e6) * width;
      double T = HL_IF97_T_CRITICAL + g_rand_double_range (rand, -4.0, 4.0) * width;
      g_assert_cmpint (hl_fluid_state_pT (hl_fluid_water (), p, T, &there), ==, HL_OK);
      g_assert_cmpint (state_ph (p, there.h, &back), ==, HL_OK);
      assert_same_state (&back, &there);
      g_assert_cmpint (state_ps (p, there.s, &back), ==, HL_OK);
      assert_same_state (&back, &there);
    }
}

static void
test_mixture_round_trips_close (void)
{
  g_autoptr (GRand) rand = g_rand_new_with_seed (34);
  for (int i = 0; i < 20000; i++)
    {
      HlState there, back;
      double p = i % 3 ? random_log (rand, 612.0, 22.06e6) : g_rand_double_range (rand, 16e6, 22.06e6);
      double x = g_rand_double_range (rand, 1e-6, 1.0 - 1e-6);
      g_assert_cmpint (hl_fluid_state_px (hl_fluid_water (), p, x, &there), ==, HL_OK);
      g_assert_cmpint (state_ph (p, there.h, &back), ==, HL_OK);
      assert_mixture (&back, &there);
      g_assert_cmpint (state_ps (p, there.s, &back), ==, HL_OK);
      assert_mixture (&back, &there);
    }
}

/* From (p,h) the ends of the line are single-phase, next to them is mixture. */
static void
test_line_divides_the_phases (void)
{
  for (double T = 274.0; T < 647.0; T += 0.37)
    {
      HlSaturation sat;
      HlState state;
      g_assert_cmpint (hl_fluid_saturation_T (hl_fluid_water (), T, &sat), ==, HL_OK);
      double span = sat.h_vapour - sat.h_liquid;
      static const struct { double at; HlPhase phase; } rows[] = {
        { -1e-3, HL_PHASE_LIQUID }, { 1e-7, HL_PHASE_TWO_PHASE }, { 0.5, HL_PHASE_TWO_PHASE },
        { 1.0 - 1e-7, HL_PHASE_TWO_PHASE }, { 1.001, HL_PHASE_VAPOUR },
      };
      for (gsize i = 0; i < G_N_ELEMENTS (rows); i++)
        {
          if (T < 275.0 && rows[i].at < 0.0)
            continue;
          g_assert_cmpint (state_ph (sat.p, sat.h_liquid + rows[i].at * span, &state), ==, HL_OK);
          g_assert_cmpint (state.phase, ==, rows[i].phase);
          if (state.phase == HL_PHASE_TWO_PHASE)
            g_assert_cmpfloat_with_epsilon (state.x, rows[i].at, 1e-8);
          else
            g_assert_true (isnan (state.x));
        }
    }
}

typedef struct { double T_p, T_h, s_p, s_h, v_p, v_h; } Slopes;

/* Central differences of the public call. */
static Slopes
differences (double p, double h, double step_p, double step_h)
{
  HlState up, down, more, less;
  g_assert_cmpint (state_ph (p + step_p, h, &up), ==, HL_OK);
  g_assert_cmpint (state_ph (p - step_p, h, &down), ==, HL_OK);
  g_assert_cmpint (state_ph (p, h + step_h, &more), ==, HL_OK);
  g_assert_cmpint (state_ph (p, h - step_h, &less), ==, HL_OK);
  double per_p = 0.5 / step_p, per_h = 0.5 / step_h;
  return (Slopes) {
    (up.T - down.T) * per_p, (more.T - less.T) * per_h, (up.s - down.s) * per_p, (more.s - less.s) * per_h,
    (up.v - down.v) * per_p, (more.v - less.v) * per_h,
  };
}

static void
assert_slopes (const HlState *state, const Slopes *d, double relative)
{
  /* T_p = (T v_T - v)/cp passes through zero in hot liquid, v_h at 4 degrees C: floors of the usual size there. */
  assert_close ("T_p", state, state->T_p, d->T_p, relative, relative * state->v / state->cp);
  assert_close ("T_h", state, state->T_h, d->T_h, relative, 0.0);
  assert_close ("s_p", state, state->s_p, d->s_p, relative, 0.0);
  assert_close ("s_h", state, state->s_h, d->s_h, relative, 0.0);
  assert_close ("v_p", state, state->v_p, d->v_p, relative, 0.0);
  assert_close ("v_h", state, state->v_h, d->v_h, relative, relative * 1e-8 * state->v);
}

/* Steps: 1e-4 of p (in liquid at least 2e4 Pa) and 20 J/kg.  The third
 * derivative over p in a gas is about 6/p^3, hence 1e-8 of the slope; near the
 * critical point it grows with the nearness, so that a surrounding is left out
 * and region 3 asks for less; rounding of T and v (1e-15) over the steps stays
 * below 1e-7. */
static void
test_slopes_agree_with_differences (void)
{
  g_autoptr (GRand) rand = g_rand_new_with_seed (55);
  for (gsize r = 0; r < G_N_ELEMENTS (single_phase); r++)
    for (int i = 0; i < 4000; i++)
      {
        HlState state;
        double p, T;
        random_state (rand, single_phase[r], &p, &T);
        double step_p = single_phase[r] == 1 ? fmax (2e4, 1e-4 * p) : 1e-4 * p;
        double T_side = step_p * 1e-6 + 0.02;
        if (p + step_p > HL_IF97_P_MAX || is_near_border (p, T) || T > 2272.0 || T < 273.3
            || (p > 49.9e6 && T > 1073.0) || (p > 20e6 && p < 24.5e6 && T > 640.0 && T < 662.0))
          continue;
        /* Both neighbours must lie in the same region. */
        if (region_of (p + step_p, T + T_side) != single_phase[r] || region_of (p - step_p, T + T_side) != single_phase[r]
            || region_of (p + step_p, T - T_side) != single_phase[r] || region_of (p - step_p, T - T_side) != single_phase[r]
            || region_of (p * 1.01, T - 0.1) != single_phase[r] || region_of (p * 0.99, T + 0.1) != single_phase[r])
          continue;
        g_assert_cmpint (hl_fluid_state_pT (hl_fluid_water (), p, T, &state), ==, HL_OK);
        Slopes d = differences (p, state.h, step_p, 20.0);
        assert_slopes (&state, &d, single_phase[r] == 3 ? 1e-5 : 1e-6);
        assert_close ("s_h = 1/T", &state, state.s_h * T, 1.0, 1e-12, 0.0);
        assert_close ("s_p = -v/T", &state, state.s_p * T, -state.v, 1e-12, 0.0);
        assert_close ("T_h = 1/cp", &state, state.T_h * state.cp, 1.0, 1e-12, 0.0);
      }
}

static void
test_mixture_slopes_agree_with_differences (void)
{
  g_autoptr (GRand) rand = g_rand_new_with_seed (56);
  for (int i = 0; i < 4000; i++)
    {
      HlState state;
      double p = i % 3 ? random_log (rand, 700.0, 21.5e6) : g_rand_double_range (rand, 16e6, 21.5e6);
      double x = g_rand_double_range (rand, 0.02, 0.98);
      if (fabs (p / HL_IF97_P_SAT_13 - 1.0) < 1e-3)
        continue;
      g_assert_cmpint (hl_fluid_state_px (hl_fluid_water (), p, x, &state), ==, HL_OK);
      Slopes d = differences (p, state.h, 1e-5 * p, 20.0);
      assert_close ("T_p", &state, state.T_p, d.T_p, 1e-6, 0.0);
      assert_close ("s_p", &state, state.s_p, d.s_p, 1e-6, 0.0);
      assert_close ("s_h", &state, state.s_h, d.s_h, 1e-6, 0.0);
      assert_close ("v_p", &state, state.v_p, d.v_p, 1e-6, 0.0);
      assert_close ("v_h", &state, state.v_h, d.v_h, 1e-6, 0.0);
      g_assert_cmpfloat (state.T_h, ==, 0.0);
      g_assert_cmpfloat_with_epsilon (d.T_h, 0.0, 1e-12);
      /* The mixture's own slopes against the laws that exact phase equilibrium would give. */
      assert_close ("s_h = 1/T", &state, state.s_h * state.T, 1.0, 1e-4, 0.0);
      assert_close ("s_p = -v/T", &state, state.s_p * state.T, -state.v, 2e-3, 0.0);
    }
}

static void
assert_between (double value, double a, double b)
{
  g_assert_cmpfloat (value, >=, fmin (a, b));
  g_assert_cmpfloat (value, <=, fmax (a, b));
}

static void
assert_boundary_state (double p, double T, const HlState *below, const HlState *above)
{
  g_assert_cmpfloat (above->h, >, below->h);
  for (double f = 0.1; f < 1.0; f += 0.2)
    {
      HlState state;
      double h = below->h + f * (above->h - below->h), s = below->s + f * (above->s - below->s);
      g_assert_cmpint (state_ph (p, h, &state), ==, HL_OK);
      g_assert_cmpfloat (state.T, ==, T);
      g_assert_cmpfloat (state.p, ==, p);
      g_assert_cmpfloat (state.h, ==, h);
      assert_between (state.s, below->s, above->s);
      assert_between (state.v, below->v, above->v);
      assert_between (state.cp, below->cp, above->cp);
      if (above->s > below->s)
        {
          g_assert_cmpint (state_ps (p, s, &state), ==, HL_OK);
          g_assert_cmpfloat (state.T, ==, T);
          g_assert_cmpfloat (state.s, ==, s);
          assert_between (state.h, below->h, above->h);
        }
    }
}

/* At the small jumps between regions no state has a value inside the jump:
 * the boundary state is returned. */
static void
test_boundary_state_inside_jumps (void)
{
  HlState below, above;
  guint n_13 = 0, n_B23 = 0, n_25 = 0;
  for (double p = 16.7e6; p < 100e6; p += 1.3e6)
    {
      double density, T = HL_IF97_T_13;
      hl_if97_region1 (p, T, &below);
      g_assert_cmpint (hl_if97_region3_density_pT (p, T, 1.0 / below.v, &density), ==, HL_OK);
      hl_if97_region3 (density, T, &above);
      if (above.h > below.h + 1.0)
        {
          assert_boundary_state (p, T, &below, &above);
          n_13++;
        }
      T = hl_if97_B23_T (p);
      hl_if97_region2 (p, T, &above);
      g_assert_cmpint (hl_if97_region3_density_pT (p, T, 1.0 / above.v, &density), ==, HL_OK);
      hl_if97_region3 (density, T, &below);
      if (above.h > below.h + 1.0)
        {
          assert_boundary_state (p, T, &below, &above);
          n_B23++;
        }
    }
  for (double p = 1e3; p < 50e6; p *= 1.5)
    {
      hl_if97_region2 (p, HL_IF97_T_25, &below);
      hl_if97_region5 (p, HL_IF97_T_25, &above);
      if (above.h > below.h + 1.0)
        {
          assert_boundary_state (p, HL_IF97_T_25, &below, &above);
          n_25++;
        }
    }
  g_assert_cmpuint (n_13, >, 5);
  g_assert_cmpuint (n_B23, >, 5);
  g_assert_cmpuint (n_25, >, 5);
}

/* The approximate edges may be off by their margin and no more, else a state
 * would be sought in the wrong region. */
static void
assert_edge (HlEdge edge, double p, const HlState *exact)
{
  double z = hl_edge_variable (edge, p);
  g_assert_cmpfloat (fabs (hl_edge_value (edge, HL_KEY_H, z) - exact->h), <, hl_edges[edge][HL_KEY_H].margin);
  g_assert_cmpfloat (fabs (hl_edge_value (edge, HL_KEY_S, z) - exact->s), <, hl_edges[edge][HL_KEY_S].margin);
}

static void
test_edges_keep_their_margins (void)
{
  HlState state;
  for (double T = HL_IF97_T_MIN; T <= HL_IF97_T_13; T += 0.01)
    {
      double p = hl_if97_psat (T);
      hl_if97_region1 (p, T, &state);
      assert_edge (HL_EDGE_LIQUID, p, &state);
      hl_if97_region2 (p, T, &state);
      assert_edge (HL_EDGE_VAPOUR, p, &state);
    }
  for (double p = HL_IF97_P_SAT_13; p <= HL_IF97_P_MAX; p += 4e3)
    {
      hl_if97_region1 (p, HL_IF97_T_13, &state);
      assert_edge (HL_EDGE_13, p, &state);
      hl_if97_region2 (p, hl_if97_B23_T (p), &state);
      assert_edge (HL_EDGE_B23, p, &state);
    }
}

/* SR3-03's saturation pressures are taken for right to 0.5 % when a state of
 * region 3 is to be clear of the mixture. */
static void
test_region3_saturation_is_near (void)
{
  for (double T = 623.2; T < 647.09; T += 0.01)
    {
      HlSaturation sat;
      g_assert_cmpint (hl_fluid_saturation_T (hl_fluid_water (), T, &sat), ==, HL_OK);
      g_assert_cmpfloat_with_epsilon (hl_if97_psat3_h (sat.h_liquid) / sat.p, 1.0, 0.002);
      g_assert_cmpfloat_with_epsilon (hl_if97_psat3_h (sat.h_vapour) / sat.p, 1.0, 0.002);
      g_assert_cmpfloat_with_epsilon (hl_if97_psat3_s (sat.s_liquid) / sat.p, 1.0, 0.002);
      g_assert_cmpfloat_with_epsilon (hl_if97_psat3_s (sat.s_vapour) / sat.p, 1.0, 0.002);
    }
}

static void
test_outside_the_range_fails (void)
{
  static const struct { double p, h; } ph[] = {
    { 1e5, -1e5 }, { 1e5, 7.5e6 }, { 60e6, 4.5e6 }, { 100.1e6, 1e6 }, { 0.0, 1e6 }, { -1e5, 1e6 }, { NAN, 1e6 },
    { 1e5, NAN }, { 1e5, INFINITY }, { 1e5, -INFINITY }, { INFINITY, 1e6 }, { 500.0, 1e6 }, { 1e5, 1e300 }, { 1e-300, 1e5 },
    { 30e6, -1e4 }, { 100e6, 0.0 },
  };
  static const struct { double p, s; } ps[] = {
    { 1e5, -100.0 }, { 1e5, 13000.0 }, { 60e6, 7500.0 }, { 100.1e6, 3000.0 }, { 0.0, 3000.0 }, { NAN, 3000.0 }, { 1e5, NAN },
    { 1e5, INFINITY }, { 1e5, -INFINITY }, { 500.0, 3000.0 }, { 1e5, 1e300 }, { 1e-300, 5000.0 }, { 100e6, -50.0 },
  };
  for (gsize i = 0; i < G_N_ELEMENTS (ph); i++)
    {
      HlState state = { .T = 1.5 };
      g_assert_cmpint (state_ph (ph[i].p, ph[i].h, &state), ==, HL_OUTSIDE_RANGE);
      g_assert_cmpfloat (state.T, ==, 1.5);
    }
  for (gsize i = 0; i < G_N_ELEMENTS (ps); i++)
    {
      HlState state = { .T = 1.5 };
      g_assert_cmpint (state_ps (ps[i].p, ps[i].s, &state), ==, HL_OUTSIDE_RANGE);
      g_assert_cmpfloat (state.T, ==, 1.5);
    }
}

/* States on the limits belong to the range in spite of rounding. */
static void
test_limits_are_inside (void)
{
  for (double p = 1.0; p <= 100e6; p = p < 100e6 ? fmin (p * 1.9, 100e6) : 2e8)
    {
      double T_max = p > HL_IF97_P_MAX_5 ? HL_IF97_T_25 : HL_IF97_T_MAX;
      HlState cold, hot, back;
      g_assert_cmpint (hl_fluid_state_pT (hl_fluid_water (), p, HL_IF97_T_MIN, &cold), ==, HL_OK);
      g_assert_cmpint (hl_fluid_state_pT (hl_fluid_water (), p, T_max, &hot), ==, HL_OK);
      g_assert_cmpint (state_ph (p, cold.h, &back), ==, HL_OK);
      assert_same_state (&back, &cold);
      g_assert_cmpint (state_ps (p, cold.s, &back), ==, HL_OK);
      assert_same_state (&back, &cold);
      g_assert_cmpint (state_ph (p, hot.h, &back), ==, HL_OK);
      assert_same_state (&back, &hot);
      g_assert_cmpint (state_ps (p, hot.s, &back), ==, HL_OK);
      assert_same_state (&back, &hot);
    }
}

int
main (int argc, char *argv[])
{
  g_test_init (&argc, &argv, NULL);
  g_test_add_func ("/fluid/water-inverse/round-trips", test_round_trips_close);
  g_test_add_func ("/fluid/water-inverse/isobars", test_isobars_are_whole);
  g_test_add_func ("/fluid/water-inverse/critical", test_round_trips_close_near_the_critical_point);
  g_test_add_func ("/fluid/water-inverse/mixture", test_mixture_round_trips_close);
  g_test_add_func ("/fluid/water-inverse/line", test_line_divides_the_phases);
  g_test_add_func ("/fluid/water-inverse/slopes", test_slopes_agree_with_differences);
  g_test_add_func ("/fluid/water-inverse/mixture-slopes", test_mixture_slopes_agree_with_differences);
  g_test_add_func ("/fluid/water-inverse/jumps", test_boundary_state_inside_jumps);
  g_test_add_func ("/fluid/water-inverse/edges", test_edges_keep_their_margins);
  g_test_add_func ("/fluid/water-inverse/saturation", test_region3_saturation_is_near);
  g_test_add_func ("/fluid/water-inverse/outside", test_outside_the_range_fails);
  g_test_add_func ("/fluid/water-inverse/limits", test_limits_are_inside);
  return g_test_run ();
}
