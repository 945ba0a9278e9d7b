/* What is common to all fluids: lookup, names, limits.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "fluid/fluid.h"

static void
test_lookup_finds_water_and_nothing_else (void)
{
  g_assert_true (hl_fluid_lookup ("water") == hl_fluid_water ());
  g_assert_null (hl_fluid_lookup ("mercury"));
  g_assert_null (hl_fluid_lookup (""));
  g_assert_null (hl_fluid_lookup (NULL));
  g_assert_cmpstr (hl_fluid_id (hl_fluid_water ()), ==, "water");
  g_assert_cmpstr (hl_fluid_name (hl_fluid_water ()), ==, "Water and steam");
  g_assert_cmpstr (hl_fluid_formulation (hl_fluid_water ()), ==, "IAPWS-IF97, R7-97(2012)");
}

/* IAPWS R7-97(2012), section 2 and Figure 1. */
static void
test_limits_are_those_of_the_release (void)
{
  HlFluidLimits limits;
  hl_fluid_limits (hl_fluid_water (), &limits);
  g_assert_cmpfloat (limits.p_min, ==, 0.0);
  g_assert_cmpfloat (limits.p_max, ==, 100e6);
  g_assert_cmpfloat (limits.T_min, ==, 273.15);
  g_assert_cmpfloat (limits.T_max, ==, 2273.15);
  g_assert_cmpfloat (limits.p_critical, ==, 22.064e6);
  g_assert_cmpfloat (limits.T_critical, ==, 647.096);
  g_assert_cmpfloat_with_epsilon (limits.v_critical, 1.0 / 322.0, 1e-15);
  g_assert_cmpfloat (limits.T_triple, ==, 273.16);
  g_assert_cmpfloat (limits.p_triple, ==, 611.657);
  g_assert_cmpfloat_with_epsilon (8.31451 / limits.molar_mass, 461.526, 1e-3);
}

static void
test_every_status_and_phase_has_words (void)
{
  g_assert_cmpstr (hl_status_describe (HL_OK), ==, "ok");
  g_assert_cmpstr (hl_status_describe (HL_OUTSIDE_RANGE), ==, "outside the published range of the fluid");
  g_assert_cmpstr (hl_status_describe (HL_NOT_CONVERGED), ==, "the iteration did not converge");
  g_assert_cmpstr (hl_status_describe ((HlStatus) 99), ==, "unknown status");
  g_assert_cmpstr (hl_phase_name (HL_PHASE_LIQUID), ==, "liquid");
  g_assert_cmpstr (hl_phase_name (HL_PHASE_TWO_PHASE), ==, "two-phase");
  g_assert_cmpstr (hl_phase_name (HL_PHASE_VAPOUR), ==, "vapour");
  g_assert_cmpstr (hl_phase_name (HL_PHASE_SUPERCRITICAL), ==, "supercritical");
  g_assert_cmpstr (hl_phase_name (HL_PHASE_GAS), ==, "gas");
  g_assert_cmpstr (hl_phase_name ((HlPhase) 99), ==, "unknown");
}

/* One state computed in many threads at once is the same, bit for bit. */
static gpointer
compute_sum (gpointer data G_GNUC_UNUSED)
{
  double *sum = g_new0 (double, 1);
  for (int i = 0; i < 20000; i++)
    {
      HlState state;
      double p = 1e4 + 3e3 * i, h = 3e5 + 130.0 * i;
      if (hl_fluid_state_ph (hl_fluid_water (), p, h, &state) == HL_OK)
        *sum += state.T + state.s + state.v;
    }
  return sum;
}

static void
test_threads_agree (void)
{
  GThread *threads[4];
  g_autofree double *expected = compute_sum (NULL);
  g_assert_cmpfloat (*expected, >, 0.0);
  for (gsize i = 0; i < G_N_ELEMENTS (threads); i++)
    threads[i] = g_thread_new ("states", compute_sum, NULL);
  for (gsize i = 0; i < G_N_ELEMENTS (threads); i++)
    {
      g_autofree double *sum = g_thread_join (threads[i]);
      g_assert_cmpfloat (*sum, ==, *expected);
    }
}

int
main (int argc, char *argv[])
{
  g_test_init (&argc, &argv, NULL);
  g_test_add_func ("/fluid/fluid/lookup", test_lookup_finds_water_and_nothing_else);
  g_test_add_func ("/fluid/fluid/limits", test_limits_are_those_of_the_release);
  g_test_add_func ("/fluid/fluid/words", test_every_status_and_phase_has_words);
  g_test_add_func ("/fluid/fluid/threads", test_threads_agree);
  return g_test_run ();
}
