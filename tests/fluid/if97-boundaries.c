/* Lines between the regions against the check points of the releases.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "if97-tables.h"

/* IAPWS R7-97(2012), text below Eq. 6: the point read both ways. */
static void
test_B23_meets_its_check_point (void)
{
  static const TableFunction p = { .of_one = hl_if97_B23_p }, T = { .of_one = hl_if97_B23_T };
  check_function_table ("if97-b23-check.csv", NULL, &p, 1, "T[K]", 1.0, NULL, 0.0, "p[MPa]", 1e6);
  check_function_table ("if97-b23-check.csv", NULL, &T, 1, "p[MPa]", 1e6, NULL, 0.0, "T[K]", 1.0);
}

/* IAPWS R7-97(2012), text below Eq. 21: the point read both ways. */
static void
test_B2bc_meets_its_check_point (void)
{
  static const TableFunction p = { .of_one = hl_if97_B2bc_p }, h = { .of_one = hl_if97_B2bc_h };
  check_function_table ("if97-b2bc-check.csv", NULL, &p, 1, "h[kJ/kg]", 1e3, NULL, 0.0, "p[MPa]", 1e6);
  check_function_table ("if97-b2bc-check.csv", NULL, &h, 1, "p[MPa]", 1e6, NULL, 0.0, "h[kJ/kg]", 1e3);
}

/* IAPWS SR2-01(2014), text below Eq. 2. */
static void
test_B2ab_meets_its_check_point (void)
{
  static const TableFunction h = { .of_one = hl_if97_B2ab_h };
  check_function_table ("sr2-01-h2ab-check.csv", NULL, &h, 1, "s[kJ/(kg K)]", 1e3, NULL, 0.0, "h[kJ/kg]", 1e3);
}

/* IAPWS SR3-03(2014), text below Eq. 1, Tables 18 and 20. */
static void
test_region3_lines_agree_with_sr3_03 (void)
{
  static const TableFunction ab = { .of_one = hl_if97_B3ab_h };
  static const TableFunction of_h = { .of_one = hl_if97_psat3_h }, of_s = { .of_one = hl_if97_psat3_s };
  check_function_table ("sr3-03-h3ab-check.csv", NULL, &ab, 1, "p[MPa]", 1e6, NULL, 0.0, "h[kJ/kg]", 1e3);
  check_function_table ("sr3-03-table18-psat3_h.csv", NULL, &of_h, 1, "h[kJ/kg]", 1e3, NULL, 0.0, "p[MPa]", 1e6);
  check_function_table ("sr3-03-table20-psat3_s.csv", NULL, &of_s, 1, "s[kJ/(kg K)]", 1e3, NULL, 0.0, "p[MPa]", 1e6);
}

/* IAPWS SR4-04(2014), Tables 11 and 18, and the check values of Eq. 7. */
static void
test_lines_of_entropy_agree_with_sr4_04 (void)
{
  static const TableFunction liquid[] = {
    { .name = "h1", .of_one = hl_if97_h_liquid_1 }, { .name = "h3a", .of_one = hl_if97_h_liquid_3a },
  };
  static const TableFunction vapour[] = {
    { .name = "h2ab", .of_one = hl_if97_h_vapour_2ab }, { .name = "h2c3b", .of_one = hl_if97_h_vapour_2c3b },
  };
  static const TableFunction B13 = { .of_one = hl_if97_B13_h };
  check_function_table ("sr4-04-table11-h_liq.csv", "eq[-]", liquid, 2, "s[kJ/(kg K)]", 1e3, NULL, 0.0, "h[kJ/kg]", 1e3);
  check_function_table ("sr4-04-table18-h_vap.csv", "eq[-]", vapour, 2, "s[kJ/(kg K)]", 1e3, NULL, 0.0, "h[kJ/kg]", 1e3);
  check_function_table ("sr4-04-hB13.csv", NULL, &B13, 1, "s[kJ/(kg K)]", 1e3, NULL, 0.0, "h[kJ/kg]", 1e3);
}

int
main (int argc, char *argv[])
{
  g_test_init (&argc, &argv, NULL);
  g_test_add_func ("/fluid/if97-boundaries/B23", test_B23_meets_its_check_point);
  g_test_add_func ("/fluid/if97-boundaries/B2bc", test_B2bc_meets_its_check_point);
  g_test_add_func ("/fluid/if97-boundaries/B2ab", test_B2ab_meets_its_check_point);
  g_test_add_func ("/fluid/if97-boundaries/sr3-03", test_region3_lines_agree_with_sr3_03);
  g_test_add_func ("/fluid/if97-boundaries/sr4-04", test_lines_of_entropy_agree_with_sr4_04);
  return g_test_run ();
}
