/* Backward equations T(p,h) of region 2 against their table.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "if97-tables.h"

/* IAPWS R7-97(2012), Table 24, all printed digits, of the equation itself without any polish. */
static void
test_T_ph_agrees_with_table24 (void)
{
  static const TableFunction functions[] = {
    { .name = "2a", .of_two = hl_if97_T_ph_2a },
    { .name = "2b", .of_two = hl_if97_T_ph_2b },
    { .name = "2c", .of_two = hl_if97_T_ph_2c },
  };
  check_function_table ("if97-r2-table24-T_ph.csv", "sub[-]", functions, G_N_ELEMENTS (functions),
                        "p[MPa]", 1e6, "h[kJ/kg]", 1e3, "T[K]", 1.0);
}

int
main (int argc, char *argv[])
{
  g_test_init (&argc, &argv, NULL);
  g_test_add_func ("/fluid/if97-backward2-ph/table24", test_T_ph_agrees_with_table24);
  return g_test_run ();
}
