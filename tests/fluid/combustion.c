/* Combustion: balances of elements and energy, flame temperatures of textbooks.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "fluid/combustion.h"

#include "fluid/humid-air.h"
#include "gas-check.h"

static HlFuel
fuel_of (const char *text)
{
  g_autoptr (GError) error = NULL;
  HlFuel fuel = { 0 };
  hl_fuel_find (text, &fuel, &error);
  g_assert_no_error (error);
  return fuel;
}

static HlCombustion
burnt (const HlFuel *fuel, const HlFluid *air, double excess)
{
  g_autoptr (GError) error = NULL;
  HlCombustion combustion = { 0 };
  hl_combustion (fuel, air, excess, &combustion, &error);
  g_assert_no_error (error);
  return combustion;
}

static double
of_flame (const char *kind, const char *subject, const char *at)
{
  gboolean is_flame = strcmp (kind, "flame") == 0;
  HlFuel fuel = fuel_of (subject);
  HlCombustion combustion = burnt (&fuel, gas_of ("air"), is_flame ? g_ascii_strtod (at, NULL) : 0.0);
  HlState flame;
  g_assert_cmpint (hl_combustion_flame (&fuel, gas_of ("air"), &combustion, 101325.0, 298.15, &flame), ==, HL_OK);
  return is_flame ? flame.T : combustion.air_needed;
}

static void
test_flames_and_air_agree_with_textbooks (void)
{
  static const char *const kinds[] = { "flame", "air_needed" };
  for (gsize i = 0; i < G_N_ELEMENTS (kinds); i++)
    check_published (kinds[i], of_flame);
}

/* By hand: CH4 + 2 O2, with 21 % of oxygen 9.524 moles of air; no oxygen left. */
static void
test_methane_by_hand (void)
{
  HlFuel methane = fuel_of ("methane");
  const HlFluid *air = gas_of ("gas:N2=0.79,O2=0.21");
  HlCombustion combustion = burnt (&methane, air, 0.0);
  double y[32], total = 2.0 / 0.21 * 0.79 + 1.0 + 2.0;
  hl_gas_moles (combustion.gas, y);
  g_assert_cmpfloat_with_epsilon (y[hl_gas_species_find ("CO2")], 1.0 / total, 1e-8);
  g_assert_cmpfloat_with_epsilon (y[hl_gas_species_find ("H2O")], 2.0 / total, 1e-8);
  g_assert_cmpfloat_with_epsilon (y[hl_gas_species_find ("O2")], 0.0, 1e-8);
  g_assert_cmpfloat_with_epsilon (combustion.co2, 44.0098 / 16.0428, 1e-4);
  g_assert_cmpfloat_with_epsilon (combustion.oxygen_dry, 0.0, 1e-12);
  g_assert_cmpfloat_with_epsilon (combustion.co2_dry, 1.0 / (total - 2.0), 1e-8);
}

/* Laws, for every named fuel, dry and humid air, several excesses: mass is kept, the elements are kept, cooling the gas to
 * 298.15 K gives the lower heating value with all water as vapour, the higher one with the condensed part. */
static void
test_balances_close (void)
{
  g_auto (GStrv) names = hl_fuel_list ();
  const HlFluid *airs[] = { gas_of ("air"), hl_humid_air_gas (0.012, NULL) };
  for (guint i = 0; names[i] != NULL; i++)
    for (gsize k = 0; k < G_N_ELEMENTS (airs); k++)
      for (double excess = 0.0; excess < 2.0; excess += 0.45)
        {
          HlFuel fuel = fuel_of (names[i]);
          HlCombustion combustion = burnt (&fuel, airs[k], excess);
          HlFluidLimits limits;
          HlState air;
          double gas_mass[32], air_mass[32];
          hl_gas_mass (combustion.gas, gas_mass);
          hl_gas_mass (airs[k], air_mass);
          hl_fluid_limits (combustion.gas, &limits);
          g_assert_cmpfloat_with_epsilon (combustion.gas_mass, combustion.air + 1.0 - fuel.ash, 1e-12);
          int co2 = hl_gas_species_find ("CO2"), ar = hl_gas_species_find ("Ar");
          g_assert_cmpfloat_with_epsilon (gas_mass[co2] * combustion.gas_mass, fuel.co2 + air_mass[co2] * combustion.air, 2e-7 * combustion.gas_mass);
          g_assert_cmpfloat_with_epsilon (gas_mass[ar] * combustion.gas_mass, air_mass[ar] * combustion.air, 2e-7 * combustion.gas_mass);
          g_assert_cmpint (hl_fluid_state_pT (airs[k], 101325.0, 298.15, &air), ==, HL_OK);
          double heat = fuel.h_formation + combustion.air * air.h - combustion.gas_mass * hl_gas_zero_enthalpy (combustion.gas);
          g_assert_cmpfloat_with_epsilon (heat / fuel.lhv, 1.0, 2e-5);
        }
}

/* Condensed at 298.15 K, methane without excess gives its higher heating value less what stays as vapour. */
static void
test_condensing_reaches_for_the_higher_heating_value (void)
{
  HlFuel methane = fuel_of ("methane");
  HlCombustion combustion = burnt (&methane, gas_of ("air"), 0.0);
  HlState air, cold;
  g_assert_cmpint (hl_fluid_state_pT (gas_of ("air"), 101325.0, 298.15, &air), ==, HL_OK);
  g_assert_cmpint (hl_fluid_state_pT (combustion.gas, 101325.0, 298.15, &cold), ==, HL_OK);
  double heat = methane.h_formation + combustion.air * air.h - combustion.gas_mass * cold.h;
  double condensed = 1.0 - cold.x, water = 2.0 * 18.01528 / 16.04276;
  g_assert_cmpfloat_with_epsilon (heat, methane.lhv + (methane.hhv - methane.lhv) * condensed * combustion.gas_mass / water, 2e3);
  g_assert_cmpfloat (heat, >, methane.lhv + 0.8 * (methane.hhv - methane.lhv));
}

static void
test_excess_follows_from_oxygen (void)
{
  static const char *const fuels[] = { "natural-gas", "hard-coal", "wood-chips", "municipal-waste" };
  const HlFluid *airs[] = { gas_of ("air"), hl_humid_air_gas (0.02, NULL) };
  for (gsize i = 0; i < G_N_ELEMENTS (fuels); i++)
    for (gsize k = 0; k < G_N_ELEMENTS (airs); k++)
      for (double excess = 0.0; excess < 3.0; excess += 0.37)
        {
          HlFuel fuel = fuel_of (fuels[i]);
          double found = NAN;
          g_assert_true (hl_combustion_excess_of_oxygen (&fuel, airs[k], burnt (&fuel, airs[k], excess).oxygen_dry, &found, NULL));
          g_assert_cmpfloat_with_epsilon (found, excess, 1e-9);
        }
}

static void
test_refusals_say_why (void)
{
  g_autoptr (GError) error = NULL;
  HlFuel methane = fuel_of ("methane");
  HlCombustion combustion;
  double excess;
  g_assert_false (hl_combustion (&methane, gas_of ("gas:N2=1"), 0.1, &combustion, &error));
  g_assert_cmpstr (error->message, ==, "gas:N2=1 is no air to burn with: it is a gas with at least 1 % of O2");
  g_clear_error (&error);
  g_assert_false (hl_combustion (&methane, hl_fluid_water (), 0.1, &combustion, &error));
  g_clear_error (&error);
  g_assert_false (hl_combustion (&methane, gas_of ("gas:O2=0.5,CH4=0.5"), 0.1, &combustion, &error));
  g_assert_cmpstr (error->message, ==, "gas:O2=0.5,CH4=0.5 is no air to burn with: its CH4 burns itself");
  g_clear_error (&error);
  g_assert_false (hl_combustion (&methane, gas_of ("air"), -0.1, &combustion, &error));
  g_assert_cmpstr (error->message, ==, "an excess of air of -10 % is none to burn completely with: it lies between 0 and 5000 %");
  g_clear_error (&error);
  g_assert_false (hl_combustion_excess_of_oxygen (&methane, gas_of ("air"), 0.21, &excess, &error));
  g_assert_nonnull (strstr (error->message, "21 % of oxygen in the dry flue gas is not possible"));
  g_clear_error (&error);
  HlFuel peroxide = fuel_of ("mass:C=0.1,O=0.9,LHV=1");
  g_assert_false (hl_combustion (&peroxide, gas_of ("air"), 0.0, &combustion, &error));
  g_assert_nonnull (strstr (error->message, "needs no air"));
}

int
main (int argc, char *argv[])
{
  g_test_init (&argc, &argv, NULL);
  g_test_add_func ("/fluid/combustion/textbooks", test_flames_and_air_agree_with_textbooks);
  g_test_add_func ("/fluid/combustion/methane", test_methane_by_hand);
  g_test_add_func ("/fluid/combustion/balances", test_balances_close);
  g_test_add_func ("/fluid/combustion/condensing", test_condensing_reaches_for_the_higher_heating_value);
  g_test_add_func ("/fluid/combustion/oxygen", test_excess_follows_from_oxygen);
  g_test_add_func ("/fluid/combustion/refusals", test_refusals_say_why);
  return g_test_run ();
}
