/* Backward equations of region 1 against their tables.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "if97-tables.h"

/* IAPWS R7-97(2012), Table 7, all printed digits, of the equation itself without any polish. */
static void
test_T_ph_agrees_with_table7 (void)
{
  static const TableFunction functions[] = {
    { .of_two = hl_if97_T_ph_1 },
  };
  check_function_table ("if97-r1-table7-T_ph.csv", NULL, functions, G_N_ELEMENTS (functions),
                        "p[MPa]", 1e6, "h[kJ/kg]", 1e3, "T[K]", 1.0);
}

/* IAPWS R7-97(2012), Table 9, all printed digits, of the equation itself without any polish. */
static void
test_T_ps_agrees_with_table9 (void)
{
  static const TableFunction functions[] = {
    { .of_two = hl_if97_T_ps_1 },
  };
  check_function_table ("if97-r1-table9-T_ps.csv", NULL, functions, G_N_ELEMENTS (functions),
                        "p[MPa]", 1e6, "s[kJ/(kg K)]", 1e3, "T[K]", 1.0);
}

/* IAPWS SR2-01(2014), Table 3, all printed digits, of the equation itself without any polish. */
static void
test_p_hs_agrees_with_sr2_01_table3 (void)
{
  static const TableFunction functions[] = {
    { .of_two = hl_if97_p_hs_1 },
  };
  check_function_table ("sr2-01-table3-r1-p_hs.csv", NULL, functions, G_N_ELEMENTS (functions),
                        "h[kJ/kg]", 1e3, "s[kJ/(kg K)]", 1e3, "p[MPa]", 1e6);
}

int
main (int argc, char *argv[])
{
  g_test_init (&argc, &argv, NULL);
  g_test_add_func ("/fluid/if97-backward1/table7", test_T_ph_agrees_with_table7);
  g_test_add_func ("/fluid/if97-backward1/table9", test_T_ps_agrees_with_table9);
  g_test_add_func ("/fluid/if97-backward1/sr2-01-table3", test_p_hs_agrees_with_sr2_01_table3);
  return g_test_run ();
}
