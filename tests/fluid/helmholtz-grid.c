/* Starts from the grid of isobars lie near the state that is sought; who finds them and when makes no difference.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "fluid/helmholtz-private.h"
#include "media.h"

typedef struct { guint n, n_without; double T[600], v[600]; } Misses;

static int
compare (const void *a, const void *b)
{
  double x = *(const double *) a, y = *(const double *) b;
  return (x > y) - (x < y);
}

/* A random state of one phase below 0.95 of the critical pressure, and what the grid says of it. */
static void
miss_of (const HlHelmholtz *eq, GRand *random, HlHeld held, Misses *misses)
{
  double p = exp (g_rand_double_range (random, log (fmax (eq->p_min_sat, 1e-4 * eq->pc)), log (0.95 * eq->pc))), q = g_rand_double_range (random, 0.05, 1.0), T, v;
  gboolean is_liquid = g_rand_boolean (random);
  HlSaturation sat;
  HlState state;
  g_assert_cmpint (hl_fluid_saturation_p (&eq->fluid, p, &sat), ==, HL_OK);
  if (hl_fluid_state_pT (&eq->fluid, p, sat.T + q * q * ((is_liquid ? eq->T_min : eq->T_max) - sat.T), &state) != HL_OK)
    return;
  if (!hl_helmholtz_grid_start (eq, p, hl_helmholtz_zeta_of_p (eq, p), held, held == HL_HELD_H ? state.h : state.s, is_liquid, &T, &v))
    {
      misses->n_without++;
      return;
    }
  misses->T[misses->n] = fabs (T / state.T - 1.0);
  misses->v[misses->n++] = fabs (v / state.v - 1.0);
}

/* What makes it worth having: in the median within 1e-4, so that one step of Newton's method is nearly enough; nine of
 * ten within 1e-3 in T and 1e-2 in v. */
static void
test_starts_are_near (void)
{
  g_auto (GStrv) ids = all_media ();
  g_autoptr (GRand) random = g_rand_new_with_seed (77);
  for (guint i = 0; ids[i] != NULL; i++)
    for (int held = HL_HELD_H; held <= HL_HELD_S; held++)
      {
        static Misses misses;
        const HlHelmholtz *eq = hl_helmholtz_of (hl_fluid_lookup (ids[i]));
        misses.n = misses.n_without = 0;
        for (int k = 0; k < 400; k++)
          miss_of (eq, random, (HlHeld) held, &misses);
        g_assert_cmpuint (misses.n_without, ==, 0);
        g_assert_cmpuint (misses.n, >, 300);
        qsort (misses.T, misses.n, sizeof *misses.T, compare);
        qsort (misses.v, misses.n, sizeof *misses.v, compare);
        double T_half = misses.T[misses.n / 2], T_most = misses.T[misses.n * 9 / 10], v_half = misses.v[misses.n / 2], v_most = misses.v[misses.n * 9 / 10];
        if (!(T_half < 1e-4 && v_half < 1e-4 && T_most < 1e-3 && v_most < 1e-2))
          g_error ("%s: T half %.1e, nine tenths %.1e; v half %.1e, nine tenths %.1e", ids[i], T_half, T_most, v_half, v_most);
      }
}

/* Near the critical point there is none. */
static void
test_none_at_the_critical_point (void)
{
  const HlHelmholtz *eq = hl_helmholtz_of (hl_fluid_lookup ("isopentane"));
  double T, v;
  g_assert_false (hl_helmholtz_grid_start (eq, eq->pc, 0.0, HL_HELD_H, 1e5, TRUE, &T, &v));
  g_assert_false (hl_helmholtz_grid_start (eq, 0.9999 * eq->pc, 0.005, HL_HELD_H, 1e5, FALSE, &T, &v));
}

/* Another zero of enthalpy has its own: the same state comes out. */
static void
test_another_zero_has_its_own (void)
{
  HlState a, b;
  const HlFluid *published = hl_fluid_lookup ("toluene"), *moved = hl_fluid_lookup ("toluene@IIR");
  g_assert_cmpint (hl_fluid_state_pT (published, 5e5, 350.0, &a), ==, HL_OK);
  g_assert_cmpint (hl_fluid_state_ph (published, a.p, a.h, &b), ==, HL_OK);
  g_assert_cmpfloat_with_epsilon (b.T, 350.0, 1e-6);
  g_assert_cmpint (hl_fluid_state_pT (moved, 5e5, 350.0, &a), ==, HL_OK);
  g_assert_cmpint (hl_fluid_state_ph (moved, a.p, a.h, &b), ==, HL_OK);
  g_assert_cmpfloat_with_epsilon (b.T, 350.0, 1e-6);
}

static gpointer
ask_at_once (gpointer data)
{
  const HlHelmholtz *eq = data;
  double T = 0.0, v = 0.0;
  double p = 0.3 * eq->pc, zeta = hl_helmholtz_zeta_of_p (eq, p);
  g_assert_true (hl_helmholtz_grid_start (eq, p, zeta, HL_HELD_H, hl_helmholtz_table (eq, HL_SAT_H_LIQUID, zeta) - 5e4, TRUE, &T, &v));
  double *answer = g_new (double, 1);
  *answer = T;
  return answer;
}

/* Must run first: threads that need a grid nobody made yet get the same answer. */
static void
test_threads_agree (void)
{
  GThread *threads[5];
  for (gsize i = 0; i < G_N_ELEMENTS (threads); i++)
    threads[i] = g_thread_new ("grid", ask_at_once, (gpointer) hl_helmholtz_of (hl_fluid_lookup ("r245fa")));
  g_autofree double *first = g_thread_join (threads[0]);
  for (gsize i = 1; i < G_N_ELEMENTS (threads); i++)
    {
      g_autofree double *other = g_thread_join (threads[i]);
      g_assert_cmpfloat (*other, ==, *first);
    }
}

int
main (int argc, char *argv[])
{
  g_test_init (&argc, &argv, NULL);
  g_test_add_func ("/fluid/helmholtz-grid/threads", test_threads_agree);
  g_test_add_func ("/fluid/helmholtz-grid/near", test_starts_are_near);
  g_test_add_func ("/fluid/helmholtz-grid/critical", test_none_at_the_critical_point);
  g_test_add_func ("/fluid/helmholtz-grid/zero", test_another_zero_has_its_own);
  return g_test_run ();
}
