/* Region 2 of IAPWS-IF97 against the release's own table.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "if97-gibbs-check.h"

/* IAPWS R7-97(2012), Table 15, all printed digits. */
static void
test_region2_agrees_with_table15 (void)
{
  check_property_table ("if97-r2-table15.csv", "p[MPa]", 1e6, hl_if97_region2);
}

/* IAPWS R7-97(2012), Table 18: the metastable continuation, all printed digits. */
static void
test_metastable_agrees_with_table18 (void)
{
  check_property_table ("if97-r2meta-table18.csv", "p[MPa]", 1e6, hl_if97_region2_metastable);
}

static const GibbsRegion region = {
  "if97-r2-table15.csv", hl_if97_region2, hl_if97_region2_enthalpy, hl_if97_region2_entropy, hl_if97_region2_at_h, hl_if97_region2_at_s,
};

static void
test_calorics_agree_with_state (void)
{
  check_calorics (&region);
}

static void
test_last_step_meets_the_state (void)
{
  check_last_step (&region);
}

int
main (int argc, char *argv[])
{
  g_test_init (&argc, &argv, NULL);
  g_test_add_func ("/fluid/if97-region2/table15", test_region2_agrees_with_table15);
  g_test_add_func ("/fluid/if97-region2/table18", test_metastable_agrees_with_table18);
  g_test_add_func ("/fluid/if97-region2/calorics", test_calorics_agree_with_state);
  g_test_add_func ("/fluid/if97-region2/last-step", test_last_step_meets_the_state);
  return g_test_run ();
}
