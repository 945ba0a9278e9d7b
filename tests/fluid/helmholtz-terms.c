/* Terms of Helmholtz equations: the release's table for water, derivatives against differences, kinds that no carried medium uses.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "csv.h"
#include "fluid/helmholtz-private.h"
#include "media.h"

/* IAPWS R6-95(2018), Table 6, all printed digits. */
static void
test_parts_agree_with_table6 (void)
{
  const HlHelmholtz *eq = hl_helmholtz_of (hl_fluid_lookup ("water-95"));
  g_autoptr (Csv) csv = csv_read ("fluid", "data", "iapws95-table6.csv", NULL);
  double delta = 838.025 / 322.0, tau = 647.096 / 500.0;
  for (guint row = 0; row < csv_n_rows (csv); row++)
    {
      HlAlpha a;
      if (strcmp (csv_text (csv, row, "part[-]"), "ideal") == 0)
        {
          hl_helmholtz_ideal (eq, tau, &a);
          a.a += log (delta);
          a.d = 1.0;
          a.dd = -1.0;
        }
      else
        hl_helmholtz_residual (eq, delta, tau, &a);
      csv_assert_prints (csv, row, "phi[-]", a.a, 0.5);
      csv_assert_prints (csv, row, "phi_d[-]", a.d / delta, 0.5);
      csv_assert_prints (csv, row, "phi_dd[-]", a.dd / (delta * delta), 0.5);
      csv_assert_prints (csv, row, "phi_t[-]", a.t / tau, 0.5);
      csv_assert_prints (csv, row, "phi_tt[-]", a.tt / (tau * tau), 0.5);
      csv_assert_prints (csv, row, "phi_dt[-]", a.dt / (delta * tau), 0.5);
    }
}

/* Central differences with step e are wrong by e^2 of the third derivative and by
 * rounding over e; both stay below 1e-6 of the largest term of the sums. */
static void
check_differences (const HlHelmholtz *eq, double delta, double tau)
{
  const double e = 1e-5;
  HlAlpha a, d_low, d_high, t_low, t_high;
  hl_helmholtz_residual (eq, delta, tau, &a);
  hl_helmholtz_residual (eq, delta * (1.0 - e), tau, &d_low);
  hl_helmholtz_residual (eq, delta * (1.0 + e), tau, &d_high);
  hl_helmholtz_residual (eq, delta, tau * (1.0 - e), &t_low);
  hl_helmholtz_residual (eq, delta, tau * (1.0 + e), &t_high);
  double scale = fabs (a.a) + fabs (a.d) + fabs (a.dd) + fabs (a.t) + fabs (a.tt) + fabs (a.dt);
  g_assert_cmpfloat_with_epsilon (a.d / scale, (d_high.a - d_low.a) / (2.0 * e) / scale, 1e-6);
  g_assert_cmpfloat_with_epsilon (a.t / scale, (t_high.a - t_low.a) / (2.0 * e) / scale, 1e-6);
  /* d of (delta a_d) is a_d + delta a_dd. */
  g_assert_cmpfloat_with_epsilon ((a.dd + a.d) / scale, (d_high.d - d_low.d) / (2.0 * e) / scale, 1e-6);
  g_assert_cmpfloat_with_epsilon ((a.tt + a.t) / scale, (t_high.t - t_low.t) / (2.0 * e) / scale, 1e-6);
  g_assert_cmpfloat_with_epsilon (a.dt / scale, (t_high.d - t_low.d) / (2.0 * e) / scale, 1e-6);
  g_assert_cmpfloat_with_epsilon (a.dt / scale, (d_high.t - d_low.t) / (2.0 * e) / scale, 1e-6);
}

static void
test_derivatives_agree_with_differences (void)
{
  g_auto (GStrv) ids = all_media ();
  for (guint i = 0; ids[i] != NULL; i++)
    for (double delta = 0.05; delta < 2.6; delta += 0.31)
      for (double tau = 0.72; tau < 1.6; tau += 0.17)
        check_differences (hl_helmholtz_of (hl_fluid_lookup (ids[i])), delta, tau);
}

/* A single power term against the formula by the C library, over all sizes that occur.
 * The argument of the exponential reaches some hundreds, so its last bit is 1e-14. */
static void
test_power_terms_follow_their_formula (void)
{
  double n = -0.3, d = 4.0, t = 2.625;
  guint8 l = 3;
  HlHelmholtz eq = { .power = { .n_terms = 1, .n = &n, .d = &d, .t = &t, .l = &l }, .power_l_max = 3 };
  for (double delta = 1e-30; delta < 12.0; delta *= 1.7)
    for (double tau = 0.05; tau < 20.0; tau *= 1.3)
      {
        HlAlpha a;
        double expected = n * pow (delta, d) * pow (tau, t) * exp (-delta * delta * delta);
        hl_helmholtz_residual (&eq, delta, tau, &a);
        if (fabs (expected) > 1e-300)
          g_assert_cmpfloat_with_epsilon (a.a / expected, 1.0, 2e-13);
        else
          g_assert_cmpfloat (fabs (a.a), <, 1e-299);
      }
  check_differences (&eq, 1.1, 1.3);
}

/* Kinds which only a user's file may have, against their formulas in other words. */
static void
test_exponential_terms_follow_their_formula (void)
{
  HlExponentialTerm term = { .n = 0.7, .d = 2.0, .t = 1.25, .g = 0.6, .l = 1.5, .k = 0.4, .m = 2.5 };
  HlHelmholtz eq = { .n_exponential = 1, .exponential = &term };
  HlAlpha a;
  double delta = 1.3, tau = 1.1;
  hl_helmholtz_residual (&eq, delta, tau, &a);
  double expected = 0.7 * pow (delta, 2.0) * pow (tau, 1.25) * exp (-0.6 * pow (delta, 1.5)) * exp (-0.4 * pow (tau, 2.5));
  g_assert_cmpfloat_with_epsilon (a.a / expected, 1.0, 1e-14);
  check_differences (&eq, delta, tau);
}

static void
test_planck_terms_follow_their_formula (void)
{
  HlPlanckTerm term = { .n = 2.5, .c = 1.0, .d = 0.4, .t = -1.7 };
  HlHelmholtz eq = { .n_planck = 1, .planck = &term, .ideal_log = 3.0 };
  HlAlpha a, low, high;
  double tau = 1.2, e = 1e-5;
  hl_helmholtz_ideal (&eq, tau, &a);
  g_assert_cmpfloat_with_epsilon (a.a, 2.5 * log (1.0 + 0.4 * exp (-1.7 * tau)) + 3.0 * log (tau), 1e-14);
  hl_helmholtz_ideal (&eq, tau * (1.0 - e), &low);
  hl_helmholtz_ideal (&eq, tau * (1.0 + e), &high);
  g_assert_cmpfloat_with_epsilon (a.t, (high.a - low.a) / (2.0 * e), 1e-8);
  g_assert_cmpfloat_with_epsilon (a.tt + a.t, (high.t - low.t) / (2.0 * e), 1e-8);
}

int
main (int argc, char *argv[])
{
  g_test_init (&argc, &argv, NULL);
  g_test_add_func ("/fluid/helmholtz-terms/table6", test_parts_agree_with_table6);
  g_test_add_func ("/fluid/helmholtz-terms/differences", test_derivatives_agree_with_differences);
  g_test_add_func ("/fluid/helmholtz-terms/power", test_power_terms_follow_their_formula);
  g_test_add_func ("/fluid/helmholtz-terms/exponential", test_exponential_terms_follow_their_formula);
  g_test_add_func ("/fluid/helmholtz-terms/planck", test_planck_terms_follow_their_formula);
  return g_test_run ();
}
