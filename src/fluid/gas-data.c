/* The species of ideal gases and the named mixtures of them, read once from the file that the library carries.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "fluid/gas-private.h"

#include <json-glib/json-glib.h>
#include <math.h>
#include <string.h>

#include "hl-gas-data.h"

static const char *const atom_names[HL_N_ATOMS] = { "H", "C", "N", "O", "S", "Cl", "Ar", "He" };

/* An upper stretch printed with nine digits misses the lower one by some 1e-8
 * where they meet: its constants move by that much, so that h and s go on without
 * a step and every enthalpy has its temperature. */
static void
join_stretches (HlGasPolynomial *polynomial)
{
  HlGasPolynomial lower = *polynomial;
  memcpy (lower.a[1], lower.a[0], sizeof lower.a[0]);
  double T = HL_GAS_T_BREAK * (1.0 + 1e-16), above = nextafter (T, 2.0 * T);
  polynomial->a[1][5] += hl_gas_h (&lower, above) - hl_gas_h (polynomial, above);
  polynomial->a[1][6] += hl_gas_s (&lower, above, log (above)) - hl_gas_s (polynomial, above, log (above));
}

static void
read_species (HlGasData *data, JsonObject *object, HlGasSpecies *species)
{
  JsonArray *T = json_object_get_array_member (object, "T_K"), *a = json_object_get_array_member (object, "a");
  JsonObject *atoms = json_object_get_object_member (object, "atoms");
  guint n_stretches = json_array_get_length (a);
  species->formula = g_strdup (json_object_get_string_member (object, "formula"));
  species->name = g_strdup (json_object_get_string_member (object, "name"));
  species->T_low = json_object_get_double_member_with_default (object, "T_low_extended_K", json_array_get_double_element (T, 0));
  species->T_high = json_array_get_double_element (T, n_stretches);
  for (guint i = 0; i < HL_N_ATOMS; i++)
    if (json_object_has_member (atoms, atom_names[i]))
      {
        species->atoms[i] = (guint) json_object_get_int_member (atoms, atom_names[i]);
        species->M += species->atoms[i] * data->atomic_mass[i];
      }
  for (guint stretch = 0; stretch < 2; stretch++)
    {
      JsonArray *row = json_array_get_array_element (a, MIN (stretch, n_stretches - 1));
      for (guint i = 0; i < 7; i++)
        species->molar.a[stretch][i] = json_array_get_double_element (row, i);
    }
  join_stretches (&species->molar);
}

static void
read_mixture (HlGasData *data, JsonObject *object, HlGasNamed *named)
{
  JsonObject *fractions = json_object_get_object_member (object, "mole_fractions");
  named->id = g_strdup (json_object_get_string_member (object, "id"));
  named->name = g_strdup (json_object_get_string_member (object, "name"));
  named->note = g_strdup (json_object_get_string_member (object, "note"));
  for (guint i = 0; i < data->n_species; i++)
    named->y[i] = json_object_get_double_member_with_default (fractions, data->species[i].formula, 0.0);
}

static HlGasData *
read_data (void)
{
  g_autoptr (GError) error = NULL;
  g_autoptr (JsonParser) parser = json_parser_new ();
  g_autoptr (GBytes) bytes = g_resource_lookup_data (hl_gas_data_get_resource (), "/local/heatloom/gases/gases.json", G_RESOURCE_LOOKUP_FLAGS_NONE, &error);
  gsize size = 0;
  const char *text = bytes != NULL ? g_bytes_get_data (bytes, &size) : NULL;
  if (text == NULL || !json_parser_load_from_data (parser, text, (gssize) size, &error))
    g_error ("gases.json: %s", error->message);      /* it is compiled in: the build is broken */
  JsonObject *root = json_node_get_object (json_parser_get_root (parser));
  JsonObject *masses = json_object_get_object_member (root, "atomic_mass_g_per_mol");
  JsonArray *species = json_object_get_array_member (root, "species"), *mixtures = json_object_get_array_member (root, "mixtures");
  HlGasData *data = g_new0 (HlGasData, 1);
  data->R = json_object_get_double_member (root, "gas_constant_J_per_molK");
  data->source = g_strdup (json_object_get_string_member (root, "source"));
  for (guint i = 0; i < HL_N_ATOMS; i++)
    data->atomic_mass[i] = 1e-3 * json_object_get_double_member (masses, atom_names[i]);
  data->n_species = json_array_get_length (species);
  data->n_named = json_array_get_length (mixtures);
  g_assert (data->n_species <= HL_GAS_MAX_SPECIES && data->n_named <= G_N_ELEMENTS (data->named));
  for (guint i = 0; i < data->n_species; i++)
    read_species (data, json_array_get_object_element (species, i), &data->species[i]);
  for (guint i = 0; i < data->n_named; i++)
    read_mixture (data, json_array_get_object_element (mixtures, i), &data->named[i]);
  data->water = (guint) hl_gas_find_species (data, "H2O", 3);
  return data;
}

const HlGasData *
hl_gas_data (void)
{
  static gsize once;
  static HlGasData *data;
  if (g_once_init_enter (&once))
    {
      data = read_data ();
      g_once_init_leave (&once, 1);
    }
  return data;
}

int
hl_gas_find_species (const HlGasData *data, const char *formula, gsize length)
{
  for (guint i = 0; i < data->n_species; i++)
    if (strlen (data->species[i].formula) == length && strncmp (data->species[i].formula, formula, length) == 0)
      return (int) i;
  return -1;
}

/**
 * hl_gas_n_species:
 *
 * Returns: how many species of gas the library knows
 */
guint
hl_gas_n_species (void)
{
  return hl_gas_data ()->n_species;
}

/**
 * hl_gas_species_formula:
 * @species: index below hl_gas_n_species()
 *
 * Returns: its formula as in ids, such as "CO2"
 */
const char *
hl_gas_species_formula (guint species)
{
  g_return_val_if_fail (species < hl_gas_n_species (), NULL);
  return hl_gas_data ()->species[species].formula;
}

/**
 * hl_gas_species_name:
 * @species: index below hl_gas_n_species()
 *
 * Returns: its English name
 */
const char *
hl_gas_species_name (guint species)
{
  g_return_val_if_fail (species < hl_gas_n_species (), NULL);
  return hl_gas_data ()->species[species].name;
}

/**
 * hl_gas_species_molar_mass:
 * @species: index below hl_gas_n_species()
 *
 * Returns: [kg/mol]
 */
double
hl_gas_species_molar_mass (guint species)
{
  g_return_val_if_fail (species < hl_gas_n_species (), NAN);
  return hl_gas_data ()->species[species].M;
}

/**
 * hl_gas_species_find:
 * @formula: such as "CO2"; capitals count
 *
 * Returns: its index, or -1 where it is not known
 */
int
hl_gas_species_find (const char *formula)
{
  return hl_gas_find_species (hl_gas_data (), formula, strlen (formula));
}
