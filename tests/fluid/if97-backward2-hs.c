/* Backward equations p(h,s) of region 2 against their table.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "if97-tables.h"

/* IAPWS SR2-01(2014), Table 9, all printed digits, of the equation itself without any polish. */
static void
test_p_hs_agrees_with_sr2_01_table9 (void)
{
  static const TableFunction functions[] = {
    { .name = "2a", .of_two = hl_if97_p_hs_2a },
    { .name = "2b", .of_two = hl_if97_p_hs_2b },
    { .name = "2c", .of_two = hl_if97_p_hs_2c },
  };
  check_function_table ("sr2-01-table9-r2-p_hs.csv", "sub[-]", functions, G_N_ELEMENTS (functions),
                        "h[kJ/kg]", 1e3, "s[kJ/(kg K)]", 1e3, "p[MPa]", 1e6);
}

int
main (int argc, char *argv[])
{
  g_test_init (&argc, &argv, NULL);
  g_test_add_func ("/fluid/if97-backward2-hs/sr2-01-table9", test_p_hs_agrees_with_sr2_01_table9);
  return g_test_run ();
}
