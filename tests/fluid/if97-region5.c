/* Region 5 of IAPWS-IF97 against the release's own table.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "if97-gibbs-check.h"

/* IAPWS R7-97(2012), Table 42, all printed digits. */
static void
test_region5_agrees_with_table42 (void)
{
  check_property_table ("if97-r5-table42.csv", "p[MPa]", 1e6, hl_if97_region5);
}

static const GibbsRegion region = {
  "if97-r5-table42.csv", hl_if97_region5, hl_if97_region5_enthalpy, hl_if97_region5_entropy, hl_if97_region5_at_h, hl_if97_region5_at_s,
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
  g_test_add_func ("/fluid/if97-region5/table42", test_region5_agrees_with_table42);
  g_test_add_func ("/fluid/if97-region5/calorics", test_calorics_agree_with_state);
  g_test_add_func ("/fluid/if97-region5/last-step", test_last_step_meets_the_state);
  return g_test_run ();
}
