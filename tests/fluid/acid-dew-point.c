/* The acid dew point against the example printed with its formula.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "gas-check.h"

/* Verhoff and Banchero 1974 as quoted in secondary texts: 38.11 mmHg of water and 9.7421e-4 mmHg of SO3 give 110.5 degC
 * (110.4 by the formula with its printed digits). */
static void
test_example_comes_out (void)
{
  g_assert_cmpfloat_with_epsilon (hl_acid_dew_point (38.11 * 133.322, 9.7421e-4 * 133.322) - 273.15, 110.45, 0.1);
  g_assert_true (isnan (hl_acid_dew_point (0.0, 1.0)));
  g_assert_true (isnan (hl_acid_dew_point (1e4, 0.0)));
}

/* Trade knowledge: more sulphur and more water both raise it; with sulphur it lies far above the water dew point. */
static void
test_sulphur_raises_it (void)
{
  double clean = hl_gas_water_dew_point (gas_of ("gas:N2=0.75,CO2=0.12,H2O=0.1,O2=0.029,SO2=0.001"), 101325.0);
  double little = hl_gas_acid_dew_point (gas_of ("gas:N2=0.75,CO2=0.12,H2O=0.1,O2=0.029,SO2=0.001"), 101325.0, 0.01);
  double much = hl_gas_acid_dew_point (gas_of ("gas:N2=0.75,CO2=0.12,H2O=0.1,O2=0.029,SO2=0.001"), 101325.0, 0.05);
  double wet = hl_gas_acid_dew_point (gas_of ("gas:N2=0.65,CO2=0.12,H2O=0.2,O2=0.029,SO2=0.001"), 101325.0, 0.05);
  g_assert_cmpfloat (clean + 50.0, <, little);
  g_assert_cmpfloat (little + 5.0, <, much);
  g_assert_cmpfloat (much + 1.0, <, wet);
  g_assert_true (isnan (hl_gas_acid_dew_point (gas_of ("air"), 101325.0, 0.05)));
  g_assert_true (isnan (hl_gas_acid_dew_point (gas_of ("gas:N2=0.8,SO2=0.1,H2O=0.1"), 101325.0, 1.5)));
}

int
main (int argc, char *argv[])
{
  g_test_init (&argc, &argv, NULL);
  g_test_add_func ("/fluid/acid-dew-point/example", test_example_comes_out);
  g_test_add_func ("/fluid/acid-dew-point/sulphur", test_sulphur_raises_it);
  return g_test_run ();
}
