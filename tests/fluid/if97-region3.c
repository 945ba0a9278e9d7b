/* Region 3 of IAPWS-IF97 against the release's own table.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "if97-tables.h"

/* IAPWS R7-97(2012), Table 33, all printed digits. */
static void
test_region3_agrees_with_table33 (void)
{
  check_property_table ("if97-r3-table33.csv", "rho[kg/m3]", 1.0, hl_if97_region3);
}

/* IAPWS R7-97(2012), section 7.1: at the critical point the equation gives the
 * critical pressure, and the isotherm is flat. */
static void
test_critical_point_is_met (void)
{
  HlIf97Helmholtz f;
  hl_if97_region3_helmholtz (HL_IF97_D_CRITICAL, HL_IF97_T_CRITICAL, &f);
  g_assert_cmpfloat_with_epsilon (f.p / HL_IF97_P_CRITICAL, 1.0, 1e-9);
  g_assert_cmpfloat_with_epsilon (f.p_d * HL_IF97_D_CRITICAL / f.p, 0.0, 1e-9);
}

int
main (int argc, char *argv[])
{
  g_test_init (&argc, &argv, NULL);
  g_test_add_func ("/fluid/if97-region3/table33", test_region3_agrees_with_table33);
  g_test_add_func ("/fluid/if97-region3/critical-point", test_critical_point_is_met);
  return g_test_run ();
}
