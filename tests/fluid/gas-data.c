/* Species of gases against published heat capacities, entropies and enthalpies of formation.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "fluid/gas-private.h"
#include "gas-check.h"

/* The values of a species by its molar polynomials: [J/(mol K)], [kJ/mol]. */
static double
molar (const char *kind, const HlGasSpecies *species, double T)
{
  double R = hl_gas_data ()->R, h = R * hl_gas_h (&species->molar, T) / 1e3;
  if (strcmp (kind, "cp") == 0)
    return R * hl_gas_cp (&species->molar, T);
  if (strcmp (kind, "s") == 0)
    return R * hl_gas_s (&species->molar, T, log (T));
  return strcmp (kind, "h_f") == 0 ? h : h - R * hl_gas_h (&species->molar, 298.15) / 1e3;
}

static double
of_species (const char *kind, const char *subject, const char *at)
{
  int i = hl_gas_species_find (subject);
  g_assert_cmpint (i, >=, 0);
  return molar (kind, &hl_gas_data ()->species[i], g_ascii_strtod (at, NULL));
}

static void
test_species_agree_with_published_tables (void)
{
  static const char *const kinds[] = { "cp", "s", "h_f", "dh" };
  for (gsize i = 0; i < G_N_ELEMENTS (kinds); i++)
    g_assert_cmpuint (check_published (kinds[i], of_species), >=, 8);
}

/* The law h' = cp and s' = cp/T over the whole range, by differences. */
static void
test_integrals_belong_to_the_heat_capacity (void)
{
  const HlGasData *data = hl_gas_data ();
  for (guint i = 0; i < data->n_species; i++)
    for (double T = data->species[i].T_low + 10.0; T < data->species[i].T_high - 10.0; T += 77.0)
      {
        const HlGasPolynomial *molar_of = &data->species[i].molar;
        double step = 1e-3 * T, cp = hl_gas_cp (molar_of, T);
        if (fabs (T - HL_GAS_T_BREAK) < 2.0 * step)
          continue;
        g_assert_cmpfloat_with_epsilon ((hl_gas_h (molar_of, T + step) - hl_gas_h (molar_of, T - step)) / (2.0 * step) / cp, 1.0, 1e-5);
        g_assert_cmpfloat_with_epsilon ((hl_gas_s (molar_of, T + step, log (T + step)) - hl_gas_s (molar_of, T - step, log (T - step))) / (2.0 * step) * T / cp,
                                        1.0, 1e-5);
      }
}

/* Both stretches meet: no step in h and s, and one of less than 1e-6 in cp/R, which the print of nine digits leaves. */
static void
test_stretches_meet (void)
{
  const HlGasData *data = hl_gas_data ();
  double below = HL_GAS_T_BREAK, above = nextafter (below, 2.0 * below);
  for (guint i = 0; i < data->n_species; i++)
    {
      const HlGasPolynomial *of = &data->species[i].molar;
      g_assert_cmpfloat_with_epsilon (hl_gas_h (of, above), hl_gas_h (of, below), 1e-9);
      g_assert_cmpfloat_with_epsilon (hl_gas_s (of, above, log (above)), hl_gas_s (of, below, log (below)), 1e-12);
      g_assert_cmpfloat_with_epsilon (hl_gas_cp (of, above), hl_gas_cp (of, below), 1e-6);
    }
}

/* Molar masses: IUPAC 1993, from memory. */
static void
test_species_are_found (void)
{
  static const struct { const char *formula, *name; double M; } rows[] = {
    { "N2", "nitrogen", 28.0135e-3 }, { "O2", "oxygen", 31.9988e-3 }, { "CO2", "carbon dioxide", 44.0098e-3 },
    { "H2O", "water vapour", 18.0153e-3 }, { "SO2", "sulphur dioxide", 64.0648e-3 }, { "HCl", "hydrogen chloride", 36.4606e-3 },
  };
  for (gsize i = 0; i < G_N_ELEMENTS (rows); i++)
    {
      int k = hl_gas_species_find (rows[i].formula);
      g_assert_cmpint (k, >=, 0);
      g_assert_cmpstr (hl_gas_species_formula ((guint) k), ==, rows[i].formula);
      g_assert_cmpstr (hl_gas_species_name ((guint) k), ==, rows[i].name);
      g_assert_cmpfloat_with_epsilon (hl_gas_species_molar_mass ((guint) k), rows[i].M, 1e-7);
    }
  g_assert_cmpint (hl_gas_species_find ("n2"), ==, -1);
  g_assert_cmpint (hl_gas_species_find (""), ==, -1);
  g_assert_cmpuint (hl_gas_n_species (), ==, 15);
}

int
main (int argc, char *argv[])
{
  g_test_init (&argc, &argv, NULL);
  g_test_add_func ("/fluid/gas-data/published", test_species_agree_with_published_tables);
  g_test_add_func ("/fluid/gas-data/integrals", test_integrals_belong_to_the_heat_capacity);
  g_test_add_func ("/fluid/gas-data/stretches", test_stretches_meet);
  g_test_add_func ("/fluid/gas-data/found", test_species_are_found);
  return g_test_run ();
}
