/* Backward equations T(p,s) of region 2 against their table.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "if97-tables.h"

/* IAPWS R7-97(2012), Table 29, all printed digits, of the equation itself without any polish. */
static void
test_T_ps_agrees_with_table29 (void)
{
  static const TableFunction functions[] = {
    { .name = "2a", .of_two = hl_if97_T_ps_2a },
    { .name = "2b", .of_two = hl_if97_T_ps_2b },
    { .name = "2c", .of_two = hl_if97_T_ps_2c },
  };
  check_function_table ("if97-r2-table29-T_ps.csv", "sub[-]", functions, G_N_ELEMENTS (functions),
                        "p[MPa]", 1e6, "s[kJ/(kg K)]", 1e3, "T[K]", 1.0);
}

int
main (int argc, char *argv[])
{
  g_test_init (&argc, &argv, NULL);
  g_test_add_func ("/fluid/if97-backward2-ps/table29", test_T_ps_agrees_with_table29);
  return g_test_run ();
}
