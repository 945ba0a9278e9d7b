/* Compositions of gases: ids, sums, refusals, one fluid for each composition.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "gas-check.h"

#include "fluid/fluid-facts.h"

static void
test_same_gas_is_same_fluid (void)
{
  const HlFluid *gas = gas_of ("gas:N2=0.75,CO2=0.08,H2O=0.10,O2=0.07");
  g_assert_cmpstr (hl_fluid_id (gas), ==, "gas:N2=0.75,O2=0.07,CO2=0.08,H2O=0.1");
  g_assert_true (gas_of (hl_fluid_id (gas)) == gas);
  g_assert_true (gas_of ("gas:O2=7,CO2=8,H2O=1e1,N2=75") == gas);
  g_assert_true (gas_of ("gas:O2=7,CO2=8,H2O=10,N2=75,Ar=0") == gas);
  g_assert_true (gas_of ("gas:O2=7,CO2=8,H2O=10,N2=74,Ar=1") != gas);
  g_assert_true (hl_fluid_is_gas (gas));
  g_assert_false (hl_fluid_is_gas (hl_fluid_water ()));
  g_assert_false (hl_fluid_has_dome (gas));
  g_assert_true (hl_fluid_has_dome (hl_fluid_water ()));
  g_assert_true (hl_fluid_has_dome (hl_fluid_lookup ("isopentane")));
}

/* What the id says is what is computed with: an id leads to itself, whatever the fractions were. */
static void
test_ids_are_stable (void)
{
  g_autoptr (GRand) random = g_rand_new_with_seed (20260801);
  guint n = hl_gas_n_species ();
  for (int i = 0; i < 300; i++)
    {
      double moles[32], sum = 0.0;
      for (guint k = 0; k < n; k++)
        moles[k] = g_rand_boolean (random) ? g_rand_double (random) : 0.0;
      moles[0] += 0.1;
      const HlFluid *gas = hl_gas_by_moles (moles, NULL);
      g_assert_nonnull (gas);
      g_assert_true (gas_of (hl_fluid_id (gas)) == gas);
      hl_gas_moles (gas, moles);
      for (guint k = 0; k < n; k++)
        sum += moles[k];
      g_assert_cmpfloat_with_epsilon (sum, 1.0, 1e-15);
      hl_gas_mass (gas, moles);
      g_assert_true (hl_gas_by_mass (moles, NULL) == gas);
    }
}

/* Composition by mass of dry air, U.S. Standard Atmosphere 1976 and handbooks, from memory: N2 75.52, O2 23.14, Ar 1.29, CO2 0.05 %. */
static void
test_air_by_mass (void)
{
  double mass[32];
  hl_gas_mass (gas_of ("air"), mass);
  g_assert_cmpfloat_with_epsilon (mass[hl_gas_species_find ("N2")], 0.7552, 2e-4);
  g_assert_cmpfloat_with_epsilon (mass[hl_gas_species_find ("O2")], 0.2314, 2e-4);
  g_assert_cmpfloat_with_epsilon (mass[hl_gas_species_find ("Ar")], 0.0129, 2e-4);
  g_assert_cmpfloat_with_epsilon (mass[hl_gas_species_find ("CO2")], 0.0005, 1e-4);
  g_assert_cmpstr (hl_fluid_id (gas_of ("air")), ==, "air");
  g_assert_cmpstr (hl_fluid_name (gas_of ("air")), ==, "Air");
}

static void
test_refusals_say_why (void)
{
  static const struct { const char *id, *says; } rows[] = {
    { "gas:N2=0.8,XY=0.2", "gas:N2=0.8,XY=0.2: species \"XY\" is not known; known are N2, O2, Ar, CO2, H2O, SO2, CO, H2, CH4, C2H6, C3H8, NH3, NO2, HCl and He" },
    { "gas:N2=0.8,N2=0.2", "gas:N2=0.8,N2=0.2: N2 stands there twice" },
    { "gas:N2=much", "gas:N2=much: the share of N2 is no number" },
    { "gas:N2=0.8;O2=0.2", "gas:N2=0.8;O2=0.2: the share of N2 is no number" },
    { "gas:", "gas:: \"\" has no share; write a gas as in \"gas:N2=0.75,CO2=0.08,H2O=0.1,O2=0.07\"" },
    { "gas:N2", "gas:N2: \"N2\" has no share; write a gas as in \"gas:N2=0.75,CO2=0.08,H2O=0.1,O2=0.07\"" },
    { "gas:N2=0.8,", "gas:N2=0.8,: \"\" has no share; write a gas as in \"gas:N2=0.75,CO2=0.08,H2O=0.1,O2=0.07\"" },
    { "gas:N2=-1,O2=2", "gas:N2=-1,O2=2: the share of N2 is -1; a share is a number of at least 0" },
    { "gas:N2=nan", "gas:N2=nan: the share of N2 is nan; a share is a number of at least 0" },
    { "gas:N2=0", "gas:N2=0: all shares are 0; a gas consists of something" },
    { "gas:H2O=0.97,N2=0.03", "gas:H2O=0.97,N2=0.03: 0.97 of it is H2O; above 0.95 it is steam: choose the medium \"water\"" },
    { "gases", "no medium has the id \"gases\"" },
  };
  for (gsize i = 0; i < G_N_ELEMENTS (rows); i++)
    {
      g_autoptr (GError) error = NULL;
      g_assert_null (hl_fluid_find (rows[i].id, &error));
      g_assert_nonnull (error);
      g_assert_true (error->domain == HL_FLUID_ERROR);
      g_assert_cmpstr (error->message, ==, rows[i].says);
      g_assert_null (hl_fluid_lookup (rows[i].id));
    }
}

static gpointer
make_many (gpointer data G_GNUC_UNUSED)
{
  gsize sum = 0;
  for (int i = 1; i < 200; i++)
    {
      g_autofree char *id = g_strdup_printf ("gas:N2=%d,O2=%d", i, 1000 - i);
      sum += (gsize) gas_of (id) * (gsize) i;
    }
  return GSIZE_TO_POINTER (sum);
}

static void
test_threads_find_the_same (void)
{
  GThread *threads[4];
  for (gsize i = 0; i < G_N_ELEMENTS (threads); i++)
    threads[i] = g_thread_new ("gases", make_many, NULL);
  gpointer first = g_thread_join (threads[0]);
  for (gsize i = 1; i < G_N_ELEMENTS (threads); i++)
    g_assert_true (g_thread_join (threads[i]) == first);
}

static void
test_facts_of_a_gas (void)
{
  HlFluidFacts facts;
  hl_fluid_facts (gas_of ("air"), &facts);
  g_assert_cmpint (facts.expansion, ==, HL_EXPANSION_NONE);
  g_assert_cmpstr (hl_expansion_type_name (facts.expansion), ==, "none");
  g_assert_true (isnan (facts.T_boiling));
  g_assert_nonnull (strstr (facts.source, "NASA TM-4513"));
  g_assert_null (hl_fluid_with_reference (gas_of ("air"), HL_REFERENCE_IIR));
}

int
main (int argc, char *argv[])
{
  g_test_init (&argc, &argv, NULL);
  g_test_add_func ("/fluid/gas-mixture/threads", test_threads_find_the_same);
  g_test_add_func ("/fluid/gas-mixture/same", test_same_gas_is_same_fluid);
  g_test_add_func ("/fluid/gas-mixture/ids", test_ids_are_stable);
  g_test_add_func ("/fluid/gas-mixture/air", test_air_by_mass);
  g_test_add_func ("/fluid/gas-mixture/refusals", test_refusals_say_why);
  g_test_add_func ("/fluid/gas-mixture/facts", test_facts_of_a_gas);
  return g_test_run ();
}
