/* Gas mixtures as fluids: their ids, each composition once and for ever, and the polynomials of the whole.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "fluid/gas-private.h"

#include <math.h>
#include <string.h>

#define PREFIX "gas:"
#define DIGITS 9
#define UNITS G_GINT64_CONSTANT (1000000000)   /* 10^DIGITS: mole fractions are whole numbers of 1e-9 */

static GMutex lock;
static GHashTable *by_id;             /* every id that was asked for -> HlGas, guarded by lock */

gboolean
hl_gas_is_mixture (const HlFluid *fluid)
{
  return fluid->state_pT == hl_gas_state_pT;
}

/* Mole fractions in steps of 1e-9 with the sum 1 exactly: what stands in the id
 * is what is computed with, and the id of an id is itself. */
static void
quantise (const double *fractions, guint n, double sum, gint64 *units)
{
  gint64 rest = UNITS;
  guint largest = 0;
  for (guint i = 0; i < n; i++)
    {
      units[i] = llround (fractions[i] / sum * (double) UNITS);
      rest -= units[i];
      if (units[i] > units[largest])
        largest = i;
    }
  units[largest] += rest;
}

static char *
canonical_id (const HlGasData *data, const gint64 *units)
{
  GString *id = g_string_new (PREFIX);
  for (guint i = 0; i < data->n_species; i++)
    {
      if (units[i] == 0)
        continue;
      if (id->str[id->len - 1] != ':')
        g_string_append_c (id, ',');
      g_string_append_printf (id, "%s=", data->species[i].formula);
      g_string_append_printf (id, "%" G_GINT64_FORMAT ".%0*" G_GINT64_FORMAT, units[i] / UNITS, DIGITS, units[i] % UNITS);
      while (id->str[id->len - 1] == '0')
        g_string_truncate (id, id->len - 1);
      if (id->str[id->len - 1] == '.')
        g_string_truncate (id, id->len - 1);
    }
  return g_string_free (id, FALSE);
}

static void
add_polynomial (HlGasPolynomial *sum, const HlGasSpecies *species, double moles, double R, double ln_y)
{
  for (guint stretch = 0; stretch < 2; stretch++)
    {
      for (guint i = 0; i < 7; i++)
        sum->a[stretch][i] += moles * R * species->molar.a[stretch][i];
      sum->a[stretch][6] -= moles * R * ln_y;
    }
}

static void
fill (HlGas *gas, const HlGasData *data)
{
  double y_dry;
  gas->M = 0.0;
  gas->fluid.limits = (HlFluidLimits) {
    .p_min = 0.0, .p_max = HL_GAS_P_MAX, .T_min = 0.0, .T_max = G_MAXDOUBLE,
    .p_critical = NAN, .T_critical = NAN, .v_critical = NAN, .p_triple = NAN, .T_triple = NAN,
  };
  for (guint i = 0; i < data->n_species; i++)
    if (gas->y[i] > 0.0)
      {
        gas->M += gas->y[i] * data->species[i].M;
        gas->fluid.limits.T_min = fmax (gas->fluid.limits.T_min, data->species[i].T_low);
        gas->fluid.limits.T_max = fmin (gas->fluid.limits.T_max, data->species[i].T_high);
      }
  gas->fluid.limits.molar_mass = gas->M;
  gas->R = data->R / gas->M;
  gas->y_water = gas->y[data->water];
  y_dry = 1.0 - gas->y_water;
  gas->n_dry = y_dry / gas->M;
  gas->n_water = gas->y_water / gas->M;
  for (guint i = 0; i < data->n_species; i++)
    if (gas->y[i] > 0.0)
      {
        add_polynomial (&gas->whole, &data->species[i], gas->y[i] / gas->M, data->R, log (gas->y[i]));
        if (i != data->water)
          add_polynomial (&gas->dry, &data->species[i], gas->y[i] / gas->M, data->R, log (gas->y[i] / y_dry));
      }
}

static HlGas *
gas_new (const HlGasData *data, const gint64 *units, const char *id, const char *name)
{
  HlGas *gas = g_new0 (HlGas, 1);
  for (guint i = 0; i < data->n_species; i++)
    gas->y[i] = (double) units[i] / (double) UNITS;
  fill (gas, data);
  gas->fluid.id = g_strdup (id);
  gas->fluid.name = name;
  gas->fluid.formulation = gas->y_water > 0.0 ? "ideal gas, NASA TM-4513 (1993); liquid water, IAPWS-IF97" : "ideal gas, NASA TM-4513 (1993)";
  gas->fluid.data = gas;
  gas->fluid.state_pT = hl_gas_state_pT;
  gas->fluid.state_ph = hl_gas_state_ph;
  gas->fluid.state_ps = hl_gas_state_ps;
  gas->fluid.state_hs = hl_gas_state_hs;
  gas->fluid.state_px = hl_gas_no_state;
  gas->fluid.state_Tx = hl_gas_no_state;
  gas->fluid.state_dT = hl_gas_state_dT;
  gas->fluid.saturation_p = hl_gas_no_saturation;
  gas->fluid.saturation_T = hl_gas_no_saturation;
  gas->fluid.explain_failure = hl_gas_explain_failure;
  return gas;
}

static const HlGas *
known (const char *id)
{
  g_mutex_lock (&lock);
  const HlGas *gas = by_id != NULL ? g_hash_table_lookup (by_id, id) : NULL;
  g_mutex_unlock (&lock);
  return gas;
}

/* Another thread may have made the same gas meanwhile: the first one stays. */
static const HlGas *
keep (const char *id, HlGas *fresh)
{
  g_mutex_lock (&lock);
  if (by_id == NULL)
    by_id = g_hash_table_new (g_str_hash, g_str_equal);
  HlGas *gas = g_hash_table_lookup (by_id, id);
  if (gas == NULL)
    {
      gas = fresh;
      g_hash_table_insert (by_id, g_strdup (id), gas);
    }
  g_mutex_unlock (&lock);
  if (gas != fresh && fresh != NULL && strcmp (gas->fluid.id, fresh->fluid.id) == 0)
    {
      g_free ((char *) fresh->fluid.id);
      g_free (fresh);
    }
  return gas;
}

static gboolean
check_sum (const HlGasData *data, const double *fractions, double *sum, GError **error)
{
  *sum = 0.0;
  for (guint i = 0; i < data->n_species; i++)
    {
      if (!(fractions[i] >= 0.0 && isfinite (fractions[i])))
        {
          g_set_error (error, HL_FLUID_ERROR, HL_FLUID_ERROR_GAS, "the share of %s is %g; a share is a number of at least 0", data->species[i].formula, fractions[i]);
          return FALSE;
        }
      *sum += fractions[i];
    }
  if (!(*sum > 0.0 && isfinite (*sum)))
    {
      g_set_error (error, HL_FLUID_ERROR, HL_FLUID_ERROR_GAS, "all shares are 0; a gas consists of something");
      return FALSE;
    }
  if (fractions[data->water] > HL_GAS_MAX_WATER * *sum)
    {
      g_set_error (error, HL_FLUID_ERROR, HL_FLUID_ERROR_GAS, "%g of it is H2O; above %g it is steam: choose the medium \"water\"",
                   fractions[data->water] / *sum, HL_GAS_MAX_WATER);
      return FALSE;
    }
  return TRUE;
}

static const HlGas *
make (const double *moles, const char *id, const char *name, GError **error)
{
  const HlGasData *data = hl_gas_data ();
  gint64 units[HL_GAS_MAX_SPECIES];
  double sum;
  if (!check_sum (data, moles, &sum, error))
    return NULL;
  quantise (moles, data->n_species, sum, units);
  g_autofree char *made = id == NULL ? canonical_id (data, units) : NULL;
  const HlGas *gas = known (id != NULL ? id : made);
  return gas != NULL ? gas : keep (id != NULL ? id : made, gas_new (data, units, id != NULL ? id : made, name));
}

static gboolean
refuse_species (const HlGasData *data, const char *id, const char *formula, gsize length, GError **error)
{
  GString *names = g_string_new (NULL);
  for (guint i = 0; i < data->n_species; i++)
    g_string_append_printf (names, "%s%s", i == 0 ? "" : i + 1 == data->n_species ? " and " : ", ", data->species[i].formula);
  g_set_error (error, HL_FLUID_ERROR, HL_FLUID_ERROR_GAS, "%s: species \"%.*s\" is not known; known are %s", id, (int) length, formula, names->str);
  g_string_free (names, TRUE);
  return FALSE;
}

/* "N2=0.75,CO2=0.08": a species once, its share as a number. */
static gboolean
parse (const HlGasData *data, const char *id, double *moles, GError **error)
{
  const char *at = id + strlen (PREFIX);
  gboolean is_seen[HL_GAS_MAX_SPECIES] = { FALSE };
  while (TRUE)
    {
      gsize length = strcspn (at, "=,");
      char *end;
      if (at[length] != '=')
        {
          g_set_error (error, HL_FLUID_ERROR, HL_FLUID_ERROR_GAS, "%s: \"%.*s\" has no share; write a gas as in \"gas:N2=0.75,CO2=0.08,H2O=0.1,O2=0.07\"",
                       id, (int) length, at);
          return FALSE;
        }
      int i = hl_gas_find_species (data, at, length);
      if (i < 0)
        return refuse_species (data, id, at, length, error);
      double share = g_ascii_strtod (at + length + 1, &end);
      if (end == at + length + 1 || (*end != ',' && *end != '\0') || is_seen[i])
        {
          g_set_error (error, HL_FLUID_ERROR, HL_FLUID_ERROR_GAS, is_seen[i] ? "%s: %s stands there twice" : "%s: the share of %s is no number",
                       id, data->species[i].formula);
          return FALSE;
        }
      is_seen[i] = TRUE;
      moles[i] = share;
      if (*end == '\0')
        return TRUE;
      at = end + 1;
    }
}

const HlFluid *
hl_gas_lookup (const char *id, GError **error)
{
  const HlGasData *data = hl_gas_data ();
  const HlGas *gas = known (id);
  double moles[HL_GAS_MAX_SPECIES] = { 0.0 };
  g_autoptr (GError) why = NULL;
  if (gas != NULL)
    return &gas->fluid;
  for (guint i = 0; i < data->n_named; i++)
    if (strcmp (id, data->named[i].id) == 0)
      return &make (data->named[i].y, id, data->named[i].name, error)->fluid;
  if (!g_str_has_prefix (id, PREFIX) || !parse (data, id, moles, error))
    return NULL;
  if ((gas = make (moles, NULL, "Gas mixture", &why)) == NULL)
    {
      g_set_error (error, HL_FLUID_ERROR, HL_FLUID_ERROR_GAS, "%s: %s", id, why->message);
      return NULL;
    }
  return &keep (id, (HlGas *) gas)->fluid;
}

void
hl_gas_list (GPtrArray *ids)
{
  const HlGasData *data = hl_gas_data ();
  for (guint i = 0; i < data->n_named; i++)
    g_ptr_array_add (ids, g_strdup (data->named[i].id));
}

/**
 * hl_gas_by_moles:
 * @fractions: a share for each species, at least 0; they are scaled to a sum of 1
 * @error: says what is wrong
 *
 * Shares are kept to 1e-9; what the id of the gas says is what is computed with.
 *
 * Returns: (nullable): the gas, which lives as long as the program
 */
const HlFluid *
hl_gas_by_moles (const double fractions[], GError **error)
{
  const HlGas *gas = make (fractions, NULL, "Gas mixture", error);
  return gas != NULL ? &gas->fluid : NULL;
}

/**
 * hl_gas_by_mass:
 * @fractions: a share of the mass for each species, at least 0; they are scaled to a sum of 1
 * @error: says what is wrong
 *
 * Returns: (nullable): the gas, which lives as long as the program
 */
const HlFluid *
hl_gas_by_mass (const double fractions[], GError **error)
{
  const HlGasData *data = hl_gas_data ();
  double moles[HL_GAS_MAX_SPECIES];
  for (guint i = 0; i < data->n_species; i++)
    moles[i] = fractions[i] / data->species[i].M;
  return hl_gas_by_moles (moles, error);
}

/**
 * hl_fluid_is_gas:
 * @fluid: a fluid
 *
 * Returns: TRUE for an ideal-gas mixture
 */
gboolean
hl_fluid_is_gas (const HlFluid *fluid)
{
  return hl_gas_is_mixture (fluid);
}

/**
 * hl_gas_moles:
 * @gas: a gas
 * @fractions: (out): mole fraction of each species, all water as vapour
 */
void
hl_gas_moles (const HlFluid *gas, double fractions[])
{
  g_return_if_fail (hl_gas_is_mixture (gas));
  memcpy (fractions, hl_gas_of (gas)->y, hl_gas_n_species () * sizeof (double));
}

/**
 * hl_gas_mass:
 * @gas: a gas
 * @fractions: (out): mass fraction of each species
 */
void
hl_gas_mass (const HlFluid *gas, double fractions[])
{
  const HlGasData *data = hl_gas_data ();
  g_return_if_fail (hl_gas_is_mixture (gas));
  for (guint i = 0; i < data->n_species; i++)
    fractions[i] = hl_gas_of (gas)->y[i] * data->species[i].M / hl_gas_of (gas)->M;
}

/**
 * hl_gas_zero_enthalpy:
 * @gas: a gas
 *
 * A state's enthalpy less this one is its sensible heat above 25 degC, on the
 * lower heating value: negative below it, and where water has condensed.
 *
 * Returns: enthalpy of the gas at 298.15 K with all water as vapour [J/kg]
 */
double
hl_gas_zero_enthalpy (const HlFluid *gas)
{
  g_return_val_if_fail (hl_gas_is_mixture (gas), NAN);
  return hl_gas_h (&hl_gas_of (gas)->whole, 298.15);
}
