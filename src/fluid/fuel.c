/* Makes fuels of a name, of components, or of an analysis; heating values on both bases.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "fluid/fuel-private.h"

#include <math.h>
#include <string.h>

#define T_STANDARD 298.15
#define LEAST_LHV 1e4                 /* of what burns [J/kg]; nitrogen has 0 but for rounding */

static G_GNUC_PRINTF (2, 3) gboolean
refuse (GError **error, const char *format, ...)
{
  va_list args;
  va_start (args, format);
  g_autofree char *text = g_strdup_vprintf (format, args);
  va_end (args);
  g_set_error_literal (error, HL_FLUID_ERROR, HL_FLUID_ERROR_FUEL, text);
  return FALSE;
}

double
hl_fuel_product_h (const char *formula)
{
  const HlGasData *data = hl_gas_data ();
  int i = hl_gas_find_species (data, formula, strlen (formula));
  g_return_val_if_fail (i >= 0, NAN);
  return data->R * hl_gas_h (&data->species[i].molar, T_STANDARD);
}

double
hl_fuel_evaporation_h (void)
{
  return hl_fuel_product_h ("H2O") - HL_GAS_H_LIQUID_WATER;
}

static double
atom (HlAtom atom_of)
{
  return hl_gas_data ()->atomic_mass[atom_of];
}

/* What burns completely leaves CO2, H2O, SO2, HCl and N2: their enthalpy per kg of fuel, water as vapour. */
static double
products_h (const HlFuel *fuel)
{
  double water = (fuel->hydrogen / atom (HL_ATOM_H) - fuel->chlorine / atom (HL_ATOM_CL)) / 2.0 + fuel->moisture / hl_gas_data ()->species[hl_gas_data ()->water].M;
  return fuel->carbon / atom (HL_ATOM_C) * hl_fuel_product_h ("CO2") + water * hl_fuel_product_h ("H2O")
         + fuel->sulphur / atom (HL_ATOM_S) * hl_fuel_product_h ("SO2") + fuel->chlorine / atom (HL_ATOM_CL) * hl_fuel_product_h ("HCl");
}

/* With the lower heating value known. */
static void
complete (HlFuel *fuel)
{
  double M_water = hl_gas_data ()->species[hl_gas_data ()->water].M;
  double condensed = (fuel->hydrogen / atom (HL_ATOM_H) - fuel->chlorine / atom (HL_ATOM_CL)) / 2.0 + (fuel->is_gas ? 0.0 : fuel->moisture / M_water);
  fuel->hhv = fuel->lhv + condensed * hl_fuel_evaporation_h ();
  fuel->h_formation = products_h (fuel) + fuel->lhv;
  fuel->co2 = fuel->carbon * (1.0 + 2.0 * atom (HL_ATOM_O) / atom (HL_ATOM_C));
}

static const HlFuelSubstance *
find_substance (const char *formula)
{
  for (guint i = 0; i < hl_n_fuel_substances; i++)
    if (strcmp (hl_fuel_substances[i].formula, formula) == 0)
      return &hl_fuel_substances[i];
  return NULL;
}

static gboolean
refuse_substance (const char *text, const char *formula, GError **error)
{
  GString *names = g_string_new (NULL);
  for (guint i = 0; i < hl_n_fuel_substances; i++)
    g_string_append_printf (names, "%s%s", i == 0 ? "" : i + 1 == hl_n_fuel_substances ? " and " : ", ", hl_fuel_substances[i].formula);
  refuse (error, "%s: component \"%s\" is not known; known are %s", text, formula, names->str);
  g_string_free (names, TRUE);
  return FALSE;
}

/* "KEY=number" */
static gboolean
split_share (const char *text, const char *item, char **key, double *value, GError **error)
{
  const char *equals = strchr (item, '=');
  char *end = NULL;
  if (equals != NULL)
    *value = g_ascii_strtod (equals + 1, &end);
  if (equals == NULL || equals == item || end == equals + 1 || *end != '\0' || !(*value >= 0.0 && isfinite (*value)))
    return refuse (error, "%s: \"%s\" is no share; write for instance CH4=0.9, a number of at least 0", text, item);
  *key = g_strndup (item, (gsize) (equals - item));
  return TRUE;
}

static void
add_component (HlFuel *fuel, const HlFuelSubstance *substance, double moles, double *mass, double *h)
{
  fuel->carbon += moles * substance->C * atom (HL_ATOM_C);
  fuel->hydrogen += moles * substance->H * atom (HL_ATOM_H);
  fuel->oxygen += moles * substance->O * atom (HL_ATOM_O);
  fuel->nitrogen += moles * substance->N * atom (HL_ATOM_N);
  fuel->sulphur += moles * substance->S * atom (HL_ATOM_S);
  *mass += moles * (substance->C * atom (HL_ATOM_C) + substance->H * atom (HL_ATOM_H) + substance->O * atom (HL_ATOM_O)
                    + substance->N * atom (HL_ATOM_N) + substance->S * atom (HL_ATOM_S));
  *h += moles * (isnan (substance->h_formation) ? hl_fuel_product_h (substance->formula) : substance->h_formation);
  fuel->is_gas = fuel->is_gas && !substance->is_liquid;
}

/* Components by moles: everything follows from the heats of formation.  Water vapour
 * counts as a component of the gas, so its hydrogen and oxygen stand among the others. */
static gboolean
from_components (const char *text, char **items, HlFuel *fuel, GError **error)
{
  double mass = 0.0, h = 0.0;
  fuel->is_gas = TRUE;
  for (guint i = 0; items[i] != NULL; i++)
    {
      g_autofree char *key = NULL;
      double moles;
      if (!split_share (text, items[i], &key, &moles, error))
        return FALSE;
      const HlFuelSubstance *substance = find_substance (key);
      if (substance == NULL)
        return refuse_substance (text, key, error);
      add_component (fuel, substance, moles, &mass, &h);
    }
  if (!(mass > 0.0))
    return refuse (error, "%s: a fuel consists of something", text);
  for (double *part = &fuel->carbon; part <= &fuel->chlorine; part++)
    *part /= mass;
  fuel->lhv = h / mass - products_h (fuel);
  complete (fuel);
  if (!(fuel->lhv > LEAST_LHV))
    return refuse (error, "%s: this does not burn; its lower heating value would be %.3f MJ/kg", text, fuel->lhv / 1e6);
  return TRUE;
}

/* S. A. Channiwala, P. P. Parikh: A unified correlation for estimating HHV of solid, liquid and gaseous fuels.
 * Fuel 81 (2002) 1051: MJ/kg from percent by mass (from memory); linear, so it holds for shares as fired too. */
static double
estimated_lhv (const HlFuel *fuel)
{
  double hhv = 1e8 * (0.3491 * fuel->carbon + 1.1783 * fuel->hydrogen + 0.1005 * fuel->sulphur - 0.1034 * fuel->oxygen - 0.0151 * fuel->nitrogen
                      - 0.0211 * fuel->ash);
  double water = (fuel->hydrogen / atom (HL_ATOM_H) - fuel->chlorine / atom (HL_ATOM_CL)) / 2.0 + fuel->moisture / hl_gas_data ()->species[hl_gas_data ()->water].M;
  return hhv - water * hl_fuel_evaporation_h ();
}

static gboolean
from_analysis (const char *text, char **items, HlFuel *fuel, GError **error)
{
  const struct { const char *key; double *value; } keys[] = {
    { "C", &fuel->carbon }, { "H", &fuel->hydrogen }, { "O", &fuel->oxygen }, { "N", &fuel->nitrogen }, { "S", &fuel->sulphur },
    { "Cl", &fuel->chlorine }, { "water", &fuel->moisture }, { "ash", &fuel->ash }, { "LHV", &fuel->lhv },
  };
  double sum = 0.0;
  for (guint i = 0; items[i] != NULL; i++)
    {
      g_autofree char *key = NULL;
      double value, *where = NULL;
      if (!split_share (text, items[i], &key, &value, error))
        return FALSE;
      for (guint k = 0; k < G_N_ELEMENTS (keys); k++)
        if (strcmp (key, keys[k].key) == 0)
          where = keys[k].value;
      if (where == NULL)
        return refuse (error, "%s: \"%s\" is none of C, H, O, N, S, Cl, water, ash, LHV", text, key);
      if (*where != 0.0)
        return refuse (error, "%s: %s stands there twice", text, key);
      *where = where == &fuel->lhv ? 1e6 * value : value;
      sum += where == &fuel->lhv ? 0.0 : value;
    }
  if (!(fabs (sum - 1.0) <= 0.01))
    return refuse (error, "%s: the parts of the analysis add up to %g; they are shares of 1 kg as fired and add up to 1", text, sum);
  for (guint k = 0; k + 1 < G_N_ELEMENTS (keys); k++)
    *keys[k].value /= sum;
  if (!(fuel->carbon + fuel->hydrogen + fuel->sulphur > 0.0))
    return refuse (error, "%s: nothing of it burns", text);
  if (fuel->hydrogen / atom (HL_ATOM_H) < fuel->chlorine / atom (HL_ATOM_CL))
    return refuse (error, "%s: less hydrogen than its chlorine needs to leave as HCl", text);
  fuel->is_lhv_estimated = !(fuel->lhv > 0.0);
  if (fuel->is_lhv_estimated)
    fuel->lhv = estimated_lhv (fuel);
  if (!(fuel->lhv > 0.0 && fuel->lhv < 150e6))
    return refuse (error, "%s: a lower heating value of %.4g MJ/kg is none of a fuel; it lies above 0 and below 150 MJ/kg", text, fuel->lhv / 1e6);
  complete (fuel);
  return TRUE;
}

static gboolean
make (const char *text, HlFuel *fuel, GError **error)
{
  gboolean is_moles = g_str_has_prefix (text, "mole:");
  g_auto (GStrv) items = g_strsplit (text + strlen ("mole:"), ",", -1);
  HlFuel made = { .fossil_share = 1.0 };
  g_strlcpy (made.name, text, sizeof made.name);
  if (!(is_moles ? from_components : from_analysis) (text, items, &made, error))
    return FALSE;
  *fuel = made;
  return TRUE;
}

/**
 * hl_fuel_find:
 * @text: a name such as "natural-gas", components by moles "mole:CH4=0.9,N2=0.1", or an
 *   analysis as fired "mass:C=0.6,H=0.04,O=0.2,water=0.1,ash=0.06,LHV=23.4"
 * @fuel: (out): the fuel; untouched on failure
 * @error: says what is wrong, and what is known instead
 *
 * Returns: whether it is a fuel
 */
gboolean
hl_fuel_find (const char *text, HlFuel *fuel, GError **error)
{
  g_return_val_if_fail (text != NULL && fuel != NULL, FALSE);
  if (g_str_has_prefix (text, "mole:") || g_str_has_prefix (text, "mass:"))
    return make (text, fuel, error);
  g_autofree char *name = g_strdelimit (g_ascii_strdown (text, -1), " _", '-');
  for (guint i = 0; i < hl_n_named_fuels; i++)
    if (strcmp (hl_named_fuels[i].name, name) == 0)
      {
        if (!make (hl_named_fuels[i].text, fuel, error))
          return FALSE;
        g_strlcpy (fuel->name, name, sizeof fuel->name);
        fuel->fossil_share = hl_named_fuels[i].fossil_share;
        fuel->source = hl_named_fuels[i].source;
        return TRUE;
      }
  GString *names = g_string_new (NULL);
  for (guint i = 0; i < hl_n_named_fuels; i++)
    g_string_append_printf (names, "%s%s", i == 0 ? "" : i + 1 == hl_n_named_fuels ? " and " : ", ", hl_named_fuels[i].name);
  refuse (error, "no fuel is called \"%s\"; known are %s; or write its components as \"mole:CH4=0.9,N2=0.1\", its analysis as "
          "\"mass:C=0.6,H=0.04,O=0.2,water=0.1,ash=0.06\"", text, names->str);
  g_string_free (names, TRUE);
  return FALSE;
}

/**
 * hl_fuel_with_moisture:
 * @fuel: a solid or liquid fuel
 * @moisture: share of water as fired, 0 to below 1
 * @other: (out): the same dry substance with this moisture; untouched on failure
 * @error: says what is wrong
 *
 * LHV = (LHV + r w)(1 - w')/(1 - w) - r w', r the heat of evaporation at 298.15 K.
 *
 * Returns: whether it still burns
 */
gboolean
hl_fuel_with_moisture (const HlFuel *fuel, double moisture, HlFuel *other, GError **error)
{
  double r = hl_fuel_evaporation_h () / hl_gas_data ()->species[hl_gas_data ()->water].M;
  HlFuel made = *fuel;
  if (fuel->is_gas)
    return refuse (error, "%s is a gas; give its water as a component", fuel->name);
  if (!(moisture >= 0.0 && moisture < 1.0))
    return refuse (error, "a moisture of %g is none; it is a share of the fuel as fired, at least 0 and below 1", moisture);
  double scale = (1.0 - moisture) / (1.0 - fuel->moisture);
  for (double *part = &made.carbon; part <= &made.chlorine; part++)
    *part *= scale;
  made.ash *= scale;
  made.moisture = moisture;
  made.lhv = (fuel->lhv + r * fuel->moisture) * scale - r * moisture;
  if (!(made.lhv > 0.0))
    return refuse (error, "%s with a moisture of %g does not burn: its lower heating value would be %.3g MJ/kg", fuel->name, moisture, made.lhv / 1e6);
  complete (&made);
  *other = made;
  return TRUE;
}

/**
 * hl_fuel_list:
 *
 * Returns: (transfer full): the names of the fuels that the library knows; free with g_strfreev()
 */
char **
hl_fuel_list (void)
{
  char **names = g_new0 (char *, hl_n_named_fuels + 1);
  for (guint i = 0; i < hl_n_named_fuels; i++)
    names[i] = g_strdup (hl_named_fuels[i].name);
  return names;
}
