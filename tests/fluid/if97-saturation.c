/* Saturation equations of IAPWS-IF97 against the release's tables, each other, and their slope.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "if97-tables.h"

#include <math.h>

/* IAPWS R7-97(2012), Table 35, all printed digits. */
static void
test_pressure_agrees_with_table35 (void)
{
  static const TableFunction f = { .of_one = hl_if97_psat };
  check_function_table ("if97-r4-table35-ps_T.csv", NULL, &f, 1, "T[K]", 1.0, NULL, 0.0, "ps[MPa]", 1e6);
}

/* IAPWS R7-97(2012), Table 36, all printed digits. */
static void
test_temperature_agrees_with_table36 (void)
{
  static const TableFunction f = { .of_one = hl_if97_Tsat };
  check_function_table ("if97-r4-table36-Ts_p.csv", NULL, &f, 1, "p[MPa]", 1e6, NULL, 0.0, "Ts[K]", 1.0);
}

/* Eqs. 30 and 31 solve the same quadratic form, so they are exact inverses. */
static void
test_equations_are_inverses (void)
{
  for (double T = HL_IF97_T_MIN; T <= HL_IF97_T_CRITICAL; T += 0.173)
    g_assert_cmpfloat_with_epsilon (hl_if97_Tsat (hl_if97_psat (T)) / T, 1.0, 1e-12);
}

static void
test_slope_agrees_with_differences (void)
{
  for (double T = 274.0; T < 647.0; T += 0.7)
    {
      double slope, p = hl_if97_psat_T (T, &slope);
      double difference = (hl_if97_psat (T + 0.002) - hl_if97_psat (T - 0.002)) / 0.004;
      g_assert_cmpfloat (p, ==, hl_if97_psat (T));
      /* The third derivative is below 0.01 p_T/K^2 (most close to the critical point), times 4e-6/6 K^2;
       * rounding of p over 0.004 K stays below 1e-10 of the slope. */
      g_assert_cmpfloat_with_epsilon (slope / difference, 1.0, 1e-8);
    }
}

/* The constants that the dispatch uses are the equation's own values. */
static void
test_border_pressures_are_those_of_the_equation (void)
{
  g_assert_cmpfloat_with_epsilon (HL_IF97_P_MIN_SAT / hl_if97_psat (HL_IF97_T_MIN), 1.0, 1e-9);
  g_assert_cmpfloat_with_epsilon (HL_IF97_P_SAT_13 / hl_if97_psat (HL_IF97_T_13), 1.0, 1e-13);
  g_assert_cmpfloat_with_epsilon (HL_IF97_P_CRITICAL / hl_if97_psat (HL_IF97_T_CRITICAL), 1.0, 1e-9);
}

int
main (int argc, char *argv[])
{
  g_test_init (&argc, &argv, NULL);
  g_test_add_func ("/fluid/if97-saturation/table35", test_pressure_agrees_with_table35);
  g_test_add_func ("/fluid/if97-saturation/table36", test_temperature_agrees_with_table36);
  g_test_add_func ("/fluid/if97-saturation/inverses", test_equations_are_inverses);
  g_test_add_func ("/fluid/if97-saturation/slope", test_slope_agrees_with_differences);
  g_test_add_func ("/fluid/if97-saturation/borders", test_border_pressures_are_those_of_the_equation);
  return g_test_run ();
}
