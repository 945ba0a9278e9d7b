/* Region 2 of IAPWS-IF97 against the release's own table.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "if97-tables.h"

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

/* What the iterations for T use must be the same functions, and its slope that of cp. */
static void
test_caloric_agrees_with_state (void)
{
  g_autoptr (Csv) csv = csv_read ("fluid", "data", "if97-r2-table15.csv", NULL);
  for (guint i = 0; i < csv_n_rows (csv); i++)
    {
      double p = csv_number (csv, i, "p[MPa]") * 1e6, T = csv_number (csv, i, "T[K]");
      HlState state, warmer, colder;
      HlIf97Caloric caloric;
      hl_if97_region2 (p, T, &state);
      hl_if97_region2 (p, T + 0.01, &warmer);
      hl_if97_region2 (p, T - 0.01, &colder);
      hl_if97_region2_caloric (p, T, &caloric);
      g_assert_cmpfloat_with_epsilon (caloric.h / state.h, 1.0, 1e-12);
      g_assert_cmpfloat_with_epsilon (caloric.s / state.s, 1.0, 1e-12);
      g_assert_cmpfloat_with_epsilon (caloric.cp / state.cp, 1.0, 1e-12);
      /* Central difference: third derivative times 1e-4/6, and rounding 1e-12 of cp over 0.02 K. */
      g_assert_cmpfloat_with_epsilon (caloric.cp_T, (warmer.cp - colder.cp) / 0.02, 1e-6 * state.cp / 10.0);
    }
}

int
main (int argc, char *argv[])
{
  g_test_init (&argc, &argv, NULL);
  g_test_add_func ("/fluid/if97-region2/table15", test_region2_agrees_with_table15);
  g_test_add_func ("/fluid/if97-region2/table18", test_metastable_agrees_with_table18);
  g_test_add_func ("/fluid/if97-region2/caloric", test_caloric_agrees_with_state);
  return g_test_run ();
}
