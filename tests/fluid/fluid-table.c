/* The table of (p,h): what it promises against the equation, slopes, refusals, its file.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "fluid/fluid-table-private.h"

#include <glib/gstdio.h>
#include <string.h>

#include "gas-check.h"

static const char *const ids[] = { "isopentane", "carbon-dioxide", "toluene", "r134a", "water-95", "ammonia" };
#define N_STATES 12000

/* A random pair over all the pressures of the table, from well outside to well inside the dome. */
static gboolean
random_pair (GRand *random, const HlHelmholtz *eq, double *p, double *h)
{
  HlState cold, hot;
  double top = fmin (HL_TABLE_LARGEST_P * eq->pc, eq->p_max), bottom = fmax (HL_TABLE_SMALLEST_P * eq->pc, eq->p_min_sat);
  *p = exp (g_rand_double_range (random, log (bottom), log (top)));
  if (hl_fluid_state_pT (&eq->fluid, *p, eq->T_min, &cold) != HL_OK || hl_fluid_state_pT (&eq->fluid, *p, eq->T_max, &hot) != HL_OK)
    return FALSE;
  *h = g_rand_double_range (random, cold.h, hot.h);
  return TRUE;
}

/* T to 1 mK, s to 1e-6, v to 1e-5 of the equation wherever it answers, and it answers nearly everywhere. */
static void
test_promise_is_kept (void)
{
  g_autoptr (GRand) random = g_rand_new_with_seed (61);
  for (gsize i = 0; i < G_N_ELEMENTS (ids); i++)
    {
      const HlFluid *fluid = hl_fluid_lookup (ids[i]);
      const HlFluidTable *table = hl_fluid_table_wait (fluid);
      const HlHelmholtz *eq = hl_helmholtz_of (fluid);
      guint n = 0, n_answered = 0;
      g_assert_nonnull (table);
      g_assert_cmpfloat (hl_fluid_table_coverage (table), >, 0.99);
      while (n < N_STATES)
        {
          double p, h;
          HlState ours, equation;
          if (!random_pair (random, eq, &p, &h) || hl_fluid_state_ph (fluid, p, h, &equation) != HL_OK)
            continue;
          n++;
          if (hl_fluid_table_state_ph (table, p, h, &ours) != HL_OK)
            continue;
          n_answered++;
          if (!(fabs (ours.T - equation.T) <= 1e-3 && fabs (ours.s - equation.s) <= 1e-6 * fmax (fabs (equation.s), eq->R)
                && fabs (ours.v / equation.v - 1.0) <= 1e-5))
            g_error ("%s at p = %.9g, h = %.9g: T off by %.2g K, s by %.2g, v by %.2g", ids[i], p, h, ours.T - equation.T, ours.s / equation.s - 1.0,
                     ours.v / equation.v - 1.0);
          if (ours.phase != equation.phase)
            /* Only on the line itself may the two disagree. */
            g_assert_cmpfloat (isnan (equation.x) ? fmin (fabs (ours.x), fabs (1.0 - ours.x)) : fmin (equation.x, 1.0 - equation.x), <, 1e-5);
        }
      if (n_answered < 0.96 * n)
        g_error ("%s: the table answers %u of %u", ids[i], n_answered, n);
    }
}

/* Good enough for Newton's method: slopes within 1 % of their size for nearly all states, 0.1 % for most. */
static void
test_slopes_are_those_of_the_equation (void)
{
  g_autoptr (GRand) random = g_rand_new_with_seed (62);
  for (gsize i = 0; i < G_N_ELEMENTS (ids); i++)
    {
      const HlFluid *fluid = hl_fluid_lookup (ids[i]);
      const HlFluidTable *table = hl_fluid_table_wait (fluid);
      guint n = 0, n_close = 0, n_near = 0;
      for (int k = 0; k < 4000; k++)
        {
          double p, h;
          HlState ours, equation;
          if (!random_pair (random, hl_helmholtz_of (fluid), &p, &h) || hl_fluid_state_ph (fluid, p, h, &equation) != HL_OK
              || hl_fluid_table_state_ph (table, p, h, &ours) != HL_OK)
            continue;
          double miss = fabs (ours.v_h - equation.v_h) / fabs (equation.v_h);
          miss = fmax (miss, fabs (ours.v_p - equation.v_p) / fabs (equation.v_p));
          miss = fmax (miss, fabs (ours.T_h - equation.T_h) * p / (fabs (equation.T_h) * p + 1e-12));
          miss = fmax (miss, fabs (ours.s_p / equation.s_p - 1.0));
          miss = fmax (miss, fabs (ours.s_h / equation.s_h - 1.0));
          n++;
          n_close += miss < 1e-3;
          n_near += miss < 1e-2;
        }
      if (!(n > 3000 && n_close > 0.9 * n && n_near > 0.985 * n))
        g_error ("%s: of %u slopes %u within 0.1 %%, %u within 1 %%", ids[i], n, n_close, n_near);
    }
}

/* No cell straddles the line: both sides of it agree with the equation's ends. */
static void
test_saturation_is_a_border (void)
{
  const HlFluid *fluid = hl_fluid_lookup ("r134a");
  const HlFluidTable *table = hl_fluid_table_wait (fluid);
  for (double p = 1e5; p < 3.7e6; p *= 1.07)
    {
      HlSaturation sat;
      HlState liquid, wet, vapour;
      g_assert_cmpint (hl_fluid_saturation_p (fluid, p, &sat), ==, HL_OK);
      g_assert_cmpint (hl_fluid_table_state_ph (table, p, sat.h_liquid - 50.0, &liquid), ==, HL_OK);
      g_assert_cmpint (hl_fluid_table_state_ph (table, p, 0.5 * (sat.h_liquid + sat.h_vapour), &wet), ==, HL_OK);
      g_assert_cmpint (hl_fluid_table_state_ph (table, p, sat.h_vapour + 50.0, &vapour), ==, HL_OK);
      g_assert_cmpint (liquid.phase, ==, HL_PHASE_LIQUID);
      g_assert_cmpint (wet.phase, ==, HL_PHASE_TWO_PHASE);
      g_assert_cmpint (vapour.phase, ==, HL_PHASE_VAPOUR);
      g_assert_cmpfloat_with_epsilon (wet.x, 0.5, 1e-7);
      g_assert_cmpfloat_with_epsilon (wet.T, sat.T, 1e-3);
      g_assert_cmpfloat_with_epsilon (liquid.v / sat.v_liquid, 1.0, 1e-3);
      g_assert_cmpfloat_with_epsilon (vapour.v / sat.v_vapour, 1.0, 1e-3);
      g_assert_cmpfloat_with_epsilon (wet.T_p / sat.T_p, 1.0, 1e-4);
    }
}

static void
test_where_it_has_no_answer (void)
{
  const HlFluid *fluid = hl_fluid_lookup ("isopentane");
  const HlFluidTable *table = hl_fluid_table_wait (fluid);
  HlFluidLimits limits;
  HlState state = { .T = 42.0 }, critical;
  hl_fluid_limits (fluid, &limits);
  g_assert_cmpint (hl_fluid_state_pT (fluid, limits.p_critical, limits.T_critical, &critical), ==, HL_OK);
  g_assert_cmpint (hl_fluid_table_state_ph (table, limits.p_critical, critical.h, &state), ==, HL_OUTSIDE_RANGE);
  g_assert_cmpint (hl_fluid_table_state_ph (table, 1e5, 1e9, &state), ==, HL_OUTSIDE_RANGE);
  g_assert_cmpint (hl_fluid_table_state_ph (table, 1e5, -1e9, &state), ==, HL_OUTSIDE_RANGE);
  g_assert_cmpint (hl_fluid_table_state_ph (table, 1e-3, 3e5, &state), ==, HL_OUTSIDE_RANGE);
  g_assert_cmpint (hl_fluid_table_state_ph (table, 1e12, 3e5, &state), ==, HL_OUTSIDE_RANGE);
  g_assert_cmpint (hl_fluid_table_state_ph (table, NAN, 3e5, &state), ==, HL_OUTSIDE_RANGE);
  g_assert_cmpint (hl_fluid_table_state_ph (table, 1e5, NAN, &state), ==, HL_OUTSIDE_RANGE);
  g_assert_cmpint (hl_fluid_table_state_ph (table, -1e5, 3e5, &state), ==, HL_OUTSIDE_RANGE);
  g_assert_cmpfloat (state.T, ==, 42.0);
  g_assert_null (hl_fluid_table_wait (hl_fluid_water ()));
  g_assert_null (hl_fluid_table_wait (gas_of ("flue-gas")));
  g_assert_null (hl_fluid_table (gas_of ("mineral-oil")));
  g_assert_cmpint (hl_fluid_table_progress (hl_fluid_water (), NULL), ==, HL_TABLE_IMPOSSIBLE);
}

/* Must run before others ask for this medium: the call comes back at once, the thread does the rest. */
static void
test_making_does_not_block (void)
{
  const HlFluid *fluid = hl_fluid_lookup ("propane");
  double share = -1.0;
  g_assert_cmpint (hl_fluid_table_progress (fluid, &share), ==, HL_TABLE_NONE);
  g_assert_cmpfloat (share, ==, 0.0);
  gint64 begin = g_get_monotonic_time ();
  g_assert_null (hl_fluid_table (fluid));
  g_assert_cmpint (hl_fluid_table_progress (fluid, &share), ==, HL_TABLE_BUILDING);
  gint64 asked = g_get_monotonic_time () - begin;
  g_assert_nonnull (hl_fluid_table_wait (fluid));
  gint64 waited = g_get_monotonic_time () - begin;
  g_assert_cmpint (hl_fluid_table_progress (fluid, &share), ==, HL_TABLE_READY);
  g_assert_cmpfloat (share, ==, 1.0);
  g_assert_true (hl_fluid_table (fluid) == hl_fluid_table_wait (fluid));
  g_assert_cmpint (asked, <, waited);
}

static HlFluidTable *
empty_table (const char *id)
{
  HlFluidTable *table = g_new0 (HlFluidTable, 1);
  table->eq = hl_helmholtz_of (hl_fluid_lookup (id));
  return table;
}

/* The file holds the table; cut, changed, or of another equation it is not read and the table stays empty. */
static void
test_damaged_files_are_ignored (void)
{
  const HlFluidTable *made = hl_fluid_table_wait (hl_fluid_lookup ("isopentane"));
  g_autofree HlFluidTable *table = empty_table ("isopentane"), *nothing = empty_table ("isopentane"), *other = empty_table ("toluene");
  g_autofree char *path = hl_table_path (made->eq), *other_path = hl_table_path (other->eq), *bytes = NULL;
  gsize length;
  g_assert_false (hl_table_load (table));      /* each test has a cache folder of its own */
  hl_table_save (made);
  g_assert_true (hl_table_load (table));
  g_assert_cmpmem (&table->data, sizeof table->data, &made->data, sizeof made->data);
  g_assert_true (g_file_get_contents (path, &bytes, &length, NULL));
  memset (&table->data, 0, sizeof table->data);

  g_assert_true (g_file_set_contents (path, bytes, (gssize) length - 1, NULL));
  g_assert_false (hl_table_load (table));
  bytes[length / 2] ^= 1;
  g_assert_true (g_file_set_contents (path, bytes, (gssize) length, NULL));
  g_assert_false (hl_table_load (table));
  g_assert_cmpmem (&table->data, sizeof table->data, &nothing->data, sizeof nothing->data);
  bytes[length / 2] ^= 1;
  bytes[16] ^= 1;                      /* the stamp of its form */
  g_assert_true (g_file_set_contents (path, bytes, (gssize) length, NULL));
  g_assert_false (hl_table_load (table));
  bytes[16] ^= 1;
  g_assert_cmpstr (path, !=, other_path);
  g_assert_true (g_file_set_contents (other_path, bytes, (gssize) length, NULL));
  g_assert_false (hl_table_load (other));
  g_unlink (other_path);
  g_assert_true (g_file_set_contents (path, "", 0, NULL));
  g_assert_false (hl_table_load (table));
  g_assert_true (g_file_set_contents (path, bytes, (gssize) length, NULL));
  g_assert_true (hl_table_load (table));
}

int
main (int argc, char *argv[])
{
  g_test_init (&argc, &argv, G_TEST_OPTION_ISOLATE_DIRS, NULL);
  g_test_add_func ("/fluid/fluid-table/thread", test_making_does_not_block);
  g_test_add_func ("/fluid/fluid-table/promise", test_promise_is_kept);
  g_test_add_func ("/fluid/fluid-table/slopes", test_slopes_are_those_of_the_equation);
  g_test_add_func ("/fluid/fluid-table/border", test_saturation_is_a_border);
  g_test_add_func ("/fluid/fluid-table/no-answer", test_where_it_has_no_answer);
  g_test_add_func ("/fluid/fluid-table/file", test_damaged_files_are_ignored);
  return g_test_run ();
}
