/* Backward equations T and v of (p,h) and (p,s) in region 3 against their tables.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "if97-tables.h"

/* IAPWS SR3-03(2014), Table 5, all printed digits, of the equation itself without any polish. */
static void
test_T_ph_agrees_with_sr3_03_table5 (void)
{
  static const TableFunction functions[] = {
    { .name = "3a", .of_two = hl_if97_T_ph_3a },
    { .name = "3b", .of_two = hl_if97_T_ph_3b },
  };
  check_function_table ("sr3-03-table5-T_ph.csv", "sub[-]", functions, G_N_ELEMENTS (functions),
                        "p[MPa]", 1e6, "h[kJ/kg]", 1e3, "T[K]", 1.0);
}

/* IAPWS SR3-03(2014), Table 8, all printed digits, of the equation itself without any polish. */
static void
test_v_ph_agrees_with_sr3_03_table8 (void)
{
  static const TableFunction functions[] = {
    { .name = "3a", .of_two = hl_if97_v_ph_3a },
    { .name = "3b", .of_two = hl_if97_v_ph_3b },
  };
  check_function_table ("sr3-03-table8-v_ph.csv", "sub[-]", functions, G_N_ELEMENTS (functions),
                        "p[MPa]", 1e6, "h[kJ/kg]", 1e3, "v[m3/kg]", 1.0);
}

/* IAPWS SR3-03(2014), Table 12, all printed digits, of the equation itself without any polish. */
static void
test_T_ps_agrees_with_sr3_03_table12 (void)
{
  static const TableFunction functions[] = {
    { .name = "3a", .of_two = hl_if97_T_ps_3a },
    { .name = "3b", .of_two = hl_if97_T_ps_3b },
  };
  check_function_table ("sr3-03-table12-T_ps.csv", "sub[-]", functions, G_N_ELEMENTS (functions),
                        "p[MPa]", 1e6, "s[kJ/(kg K)]", 1e3, "T[K]", 1.0);
}

/* IAPWS SR3-03(2014), Table 15, all printed digits, of the equation itself without any polish. */
static void
test_v_ps_agrees_with_sr3_03_table15 (void)
{
  static const TableFunction functions[] = {
    { .name = "3a", .of_two = hl_if97_v_ps_3a },
    { .name = "3b", .of_two = hl_if97_v_ps_3b },
  };
  check_function_table ("sr3-03-table15-v_ps.csv", "sub[-]", functions, G_N_ELEMENTS (functions),
                        "p[MPa]", 1e6, "s[kJ/(kg K)]", 1e3, "v[m3/kg]", 1.0);
}

int
main (int argc, char *argv[])
{
  g_test_init (&argc, &argv, NULL);
  g_test_add_func ("/fluid/if97-backward3/table5", test_T_ph_agrees_with_sr3_03_table5);
  g_test_add_func ("/fluid/if97-backward3/table8", test_v_ph_agrees_with_sr3_03_table8);
  g_test_add_func ("/fluid/if97-backward3/table12", test_T_ps_agrees_with_sr3_03_table12);
  g_test_add_func ("/fluid/if97-backward3/table15", test_v_ps_agrees_with_sr3_03_table15);
  return g_test_run ();
}
