/* Backward equation v(p,T) of region 3 and its subregions against SR5-05.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "if97-tables.h"

#include <math.h>

/* IAPWS SR5-05(2016), Tables 3 and 11, all printed digits. */
static void
check_boundaries (const char *file)
{
  static const struct { const char *name; HlIf97Boundary3 boundary; } rows[] = {
    { "3ab", HL_IF97_3AB }, { "3cd", HL_IF97_3CD }, { "3ef", HL_IF97_3EF }, { "3gh", HL_IF97_3GH },
    { "3ij", HL_IF97_3IJ }, { "3jk", HL_IF97_3JK }, { "3mn", HL_IF97_3MN }, { "3op", HL_IF97_3OP },
    { "3qu", HL_IF97_3QU }, { "3rx", HL_IF97_3RX }, { "3uv", HL_IF97_3UV }, { "3wx", HL_IF97_3WX },
  };
  g_autoptr (Csv) csv = csv_read ("fluid", "data", file, NULL);
  for (guint i = 0; i < csv_n_rows (csv); i++)
    {
      gboolean is_found = FALSE;
      for (gsize k = 0; k < G_N_ELEMENTS (rows); k++)
        if (g_str_equal (csv_text (csv, i, "eq[-]"), rows[k].name))
          {
            csv_assert_prints (csv, i, "T[K]", hl_if97_boundary3 (rows[k].boundary, csv_number (csv, i, "p[MPa]") * 1e6), 0.5);
            is_found = TRUE;
          }
      g_assert_true (is_found);
    }
}

static void
test_boundaries_agree_with_tables3_and_11 (void)
{
  check_boundaries ("sr5-05-table3-boundaries.csv");
  check_boundaries ("sr5-05-table11-boundaries-aux.csv");
}

/* IAPWS SR5-05(2016), Tables 5 and 13: the volume to all printed digits, and
 * the state lies in the subregion that the table names. */
static void
check_volumes (const char *file)
{
  g_autoptr (Csv) csv = csv_read ("fluid", "data", file, NULL);
  for (guint i = 0; i < csv_n_rows (csv); i++)
    {
      char subregion = csv_text (csv, i, "sub[-]")[1];
      double p = csv_number (csv, i, "p[MPa]") * 1e6, T = csv_number (csv, i, "T[K]");
      /* 40-digit arithmetic on the release's coefficients gives 3.70194000947e-3 where 3.701940010e-3 is printed. */
      gboolean is_misprinted = subregion == 'z' && csv_number (csv, i, "p[MPa]") > 22.063;
      csv_assert_prints (csv, i, "v[m3/kg]", hl_if97_v_pT_3 (subregion, p, T), is_misprinted ? 1.0 : 0.5);
      g_assert_cmpint (hl_if97_subregion3 (p, T), ==, subregion);
    }
}

static void
test_volumes_agree_with_tables5_and_13 (void)
{
  check_volumes ("sr5-05-table5-v_pT.csv");
  check_volumes ("sr5-05-table13-v_pT-aux.csv");
}

/* As a start the equation must be near the root everywhere: SR5-05 states 0.1 %
 * at most outside, 2 % inside the auxiliary subregions next to the critical point. */
static void
test_starting_values_are_near_the_root (void)
{
  g_autoptr (GRand) rand = g_rand_new_with_seed (20161);
  for (int i = 0; i < 20000; i++)
    {
      double p = g_rand_double_range (rand, 16.6e6, HL_IF97_P_MAX);
      if (i % 4 == 0)
        p = g_rand_double_range (rand, 21e6, 23e6);
      double T = g_rand_double_range (rand, HL_IF97_T_13, hl_if97_B23_T (p)), density;
      char subregion = hl_if97_subregion3 (p, T);
      double start = hl_if97_v_pT_3 (subregion, p, T);
      if (p < HL_IF97_P_CRITICAL && fabs (T - hl_if97_Tsat (p)) < 1e-3)
        continue;
      g_assert_cmpint (hl_if97_region3_density_pT (p, T, 1.0 / start, &density), ==, HL_OK);
      g_assert_cmpfloat_with_epsilon (start * density, 1.0, subregion >= 'u' ? 0.02 : 0.001);
    }
}

int
main (int argc, char *argv[])
{
  g_test_init (&argc, &argv, NULL);
  g_test_add_func ("/fluid/if97-region3-pT/boundaries", test_boundaries_agree_with_tables3_and_11);
  g_test_add_func ("/fluid/if97-region3-pT/volumes", test_volumes_agree_with_tables5_and_13);
  g_test_add_func ("/fluid/if97-region3-pT/starts", test_starting_values_are_near_the_root);
  return g_test_run ();
}
