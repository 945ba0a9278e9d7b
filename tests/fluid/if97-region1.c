/* Region 1 of IAPWS-IF97 against the release's own table.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "if97-gibbs-check.h"

/* IAPWS R7-97(2012), Table 5, all printed digits. */
static void
test_region1_agrees_with_table5 (void)
{
  check_property_table ("if97-r1-table5.csv", "p[MPa]", 1e6, hl_if97_region1);
}

static const GibbsRegion region = {
  "if97-r1-table5.csv", hl_if97_region1, hl_if97_region1_enthalpy, hl_if97_region1_entropy, hl_if97_region1_at_h, hl_if97_region1_at_s,
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
  g_test_add_func ("/fluid/if97-region1/table5", test_region1_agrees_with_table5);
  g_test_add_func ("/fluid/if97-region1/calorics", test_calorics_agree_with_state);
  g_test_add_func ("/fluid/if97-region1/last-step", test_last_step_meets_the_state);
  return g_test_run ();
}
