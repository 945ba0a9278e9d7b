/* Backward equations of (h,s) for region 3, the B23 boundary and the mixture against their tables.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "if97-tables.h"

/* IAPWS SR4-04(2014), Table 5, all printed digits, of the equation itself without any polish. */
static void
test_p_hs_agrees_with_sr4_04_table5 (void)
{
  static const TableFunction functions[] = {
    { .name = "3a", .of_two = hl_if97_p_hs_3a },
    { .name = "3b", .of_two = hl_if97_p_hs_3b },
  };
  check_function_table ("sr4-04-table5-r3-p_hs.csv", "sub[-]", functions, G_N_ELEMENTS (functions),
                        "h[kJ/kg]", 1e3, "s[kJ/(kg K)]", 1e3, "p[MPa]", 1e6);
}

/* IAPWS SR4-04(2014), Table 26, all printed digits, of the equation itself without any polish. */
static void
test_T_on_B23_agrees_with_sr4_04_table26 (void)
{
  static const TableFunction functions[] = {
    { .of_two = hl_if97_B23_T_hs },
  };
  check_function_table ("sr4-04-table26-TB23_hs.csv", NULL, functions, G_N_ELEMENTS (functions),
                        "h[kJ/kg]", 1e3, "s[kJ/(kg K)]", 1e3, "T[K]", 1.0);
}

/* IAPWS SR4-04(2014), Table 29, all printed digits, of the equation itself without any polish. */
static void
test_Tsat_agrees_with_sr4_04_table29 (void)
{
  static const TableFunction functions[] = {
    { .of_two = hl_if97_Tsat_hs },
  };
  check_function_table ("sr4-04-table29-Tsat_hs.csv", NULL, functions, G_N_ELEMENTS (functions),
                        "h[kJ/kg]", 1e3, "s[kJ/(kg K)]", 1e3, "T[K]", 1.0);
}

int
main (int argc, char *argv[])
{
  g_test_init (&argc, &argv, NULL);
  g_test_add_func ("/fluid/if97-backward3-hs/table5", test_p_hs_agrees_with_sr4_04_table5);
  g_test_add_func ("/fluid/if97-backward3-hs/table26", test_T_on_B23_agrees_with_sr4_04_table26);
  g_test_add_func ("/fluid/if97-backward3-hs/table29", test_Tsat_agrees_with_sr4_04_table29);
  return g_test_run ();
}
