/* Complete combustion of a fuel with air.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "fluid/combustion.h"

#include <math.h>

#include "fluid/fuel-private.h"

#define MAX_EXCESS 50.0

static double
atom (HlAtom atom_of)
{
  return hl_gas_data ()->atomic_mass[atom_of];
}

static guint
species (const char *formula)
{
  return (guint) hl_gas_species_find (formula);
}

/* Moles of O2 that 1 kg of fuel takes; negative where it brings more than it needs. */
static double
oxygen_needed (const HlFuel *fuel)
{
  return fuel->carbon / atom (HL_ATOM_C) + (fuel->hydrogen / atom (HL_ATOM_H) - fuel->chlorine / atom (HL_ATOM_CL)) / 4.0
         + fuel->sulphur / atom (HL_ATOM_S) - fuel->oxygen / (2.0 * atom (HL_ATOM_O));
}

static gboolean
check_air (const HlFuel *fuel, const HlFluid *air, GError **error)
{
  static const char *const burning[] = { "CO", "H2", "CH4", "C2H6", "C3H8", "NH3" };
  if (!hl_gas_is_mixture (air) || !(hl_gas_of (air)->y[species ("O2")] > 0.01))
    {
      g_set_error (error, HL_FLUID_ERROR, HL_FLUID_ERROR_FUEL, "%s is no air to burn with: it is a gas with at least 1 %% of O2", hl_fluid_id (air));
      return FALSE;
    }
  for (gsize i = 0; i < G_N_ELEMENTS (burning); i++)
    if (hl_gas_of (air)->y[species (burning[i])] > 0.0)
      {
        g_set_error (error, HL_FLUID_ERROR, HL_FLUID_ERROR_FUEL, "%s is no air to burn with: its %s burns itself", hl_fluid_id (air), burning[i]);
        return FALSE;
      }
  if (!(oxygen_needed (fuel) > 0.0))
    {
      g_set_error (error, HL_FLUID_ERROR, HL_FLUID_ERROR_FUEL, "%s needs no air: it brings more oxygen than it burns with", fuel->name);
      return FALSE;
    }
  return TRUE;
}

/* Moles of each species per kg of fuel, from @air_moles of air. */
static void
burn (const HlFuel *fuel, const HlGas *air, double air_moles, double *moles)
{
  const HlGasData *data = hl_gas_data ();
  for (guint i = 0; i < data->n_species; i++)
    moles[i] = air_moles * air->y[i];
  moles[species ("O2")] = fmax (0.0, moles[species ("O2")] - oxygen_needed (fuel));
  moles[species ("CO2")] += fuel->carbon / atom (HL_ATOM_C);
  moles[species ("SO2")] += fuel->sulphur / atom (HL_ATOM_S);
  moles[species ("HCl")] += fuel->chlorine / atom (HL_ATOM_CL);
  moles[species ("N2")] += fuel->nitrogen / (2.0 * atom (HL_ATOM_N));
  moles[data->water] += (fuel->hydrogen / atom (HL_ATOM_H) - fuel->chlorine / atom (HL_ATOM_CL)) / 2.0 + fuel->moisture / data->species[data->water].M;
}

/**
 * hl_combustion:
 * @fuel: a fuel
 * @air: a gas with oxygen
 * @excess_air: 0.1 for ten percent more air than is needed; 0 to 50
 * @combustion: (out): what it takes and yields; untouched on failure
 * @error: says what is wrong
 *
 * Carbon burns to CO2, hydrogen to H2O, sulphur to SO2, chlorine leaves as HCl,
 * nitrogen as N2; ash stays behind.
 *
 * Returns: whether it could be computed
 */
gboolean
hl_combustion (const HlFuel *fuel, const HlFluid *air, double excess_air, HlCombustion *combustion, GError **error)
{
  const HlGasData *data = hl_gas_data ();
  double moles[HL_GAS_MAX_SPECIES], total = 0.0;
  if (!check_air (fuel, air, error))
    return FALSE;
  if (!(excess_air >= 0.0 && excess_air <= MAX_EXCESS))
    {
      g_set_error (error, HL_FLUID_ERROR, HL_FLUID_ERROR_FUEL, "an excess of air of %g %% is none to burn completely with: it lies between 0 and %g %%",
                   1e2 * excess_air, 1e2 * MAX_EXCESS);
      return FALSE;
    }
  const HlGas *with = hl_gas_of (air);
  double needed = oxygen_needed (fuel) / with->y[species ("O2")];
  burn (fuel, with, needed * (1.0 + excess_air), moles);
  const HlFluid *gas = hl_gas_by_moles (moles, error);
  if (gas == NULL)
    return FALSE;
  for (guint i = 0; i < data->n_species; i++)
    total += moles[i];
  double dry = total - moles[data->water], mass = with->M * needed;
  *combustion = (HlCombustion) {
    .gas = gas, .excess_air = excess_air, .air_needed = mass, .air = mass * (1.0 + excess_air), .gas_mass = mass * (1.0 + excess_air) + 1.0 - fuel->ash,
    .co2 = fuel->co2, .co2_per_heat = fuel->co2 / fuel->lhv, .oxygen_dry = moles[species ("O2")] / dry, .co2_dry = moles[species ("CO2")] / dry,
  };
  return TRUE;
}

/**
 * hl_combustion_excess_of_oxygen:
 * @fuel: a fuel
 * @air: a gas with oxygen
 * @oxygen_dry: mole fraction of O2 in the dry flue gas
 * @excess_air: (out): the excess that leaves it; untouched on failure
 * @error: says what is wrong
 *
 * The dry gas grows in proportion to the excess, so the answer is closed.
 *
 * Returns: whether there is one
 */
gboolean
hl_combustion_excess_of_oxygen (const HlFuel *fuel, const HlFluid *air, double oxygen_dry, double *excess_air, GError **error)
{
  double moles[HL_GAS_MAX_SPECIES], dry = 0.0;
  const HlGasData *data = hl_gas_data ();
  if (!check_air (fuel, air, error))
    return FALSE;
  const HlGas *with = hl_gas_of (air);
  double y = with->y[species ("O2")], y_dry = y / (1.0 - with->y_water), needed = oxygen_needed (fuel) / y;
  burn (fuel, with, needed, moles);
  for (guint i = 0; i < data->n_species; i++)
    dry += i == data->water ? 0.0 : moles[i];
  /* e n y = o (d + e n (1 - y_water)) */
  double excess = oxygen_dry * dry / (needed * (y - oxygen_dry * (1.0 - with->y_water)));
  if (!(oxygen_dry >= 0.0 && oxygen_dry < y_dry && excess <= MAX_EXCESS))
    {
      g_set_error (error, HL_FLUID_ERROR, HL_FLUID_ERROR_FUEL, "%g %% of oxygen in the dry flue gas is not possible: the dry air has %g %%", 1e2 * oxygen_dry, 1e2 * y_dry);
      return FALSE;
    }
  *excess_air = excess;
  return TRUE;
}

/**
 * hl_combustion_flame:
 * @fuel: a fuel, which enters at 298.15 K
 * @air: the gas it was burnt with
 * @combustion: of hl_combustion()
 * @p: pressure [Pa]
 * @T_air: temperature of the air [K]
 * @flame: (out): the flue gas that carries all the heat; untouched on failure
 *
 * h_fuel + m_air h_air = m_gas h_gas.  The ash leaves at 298.15 K.  Nothing
 * dissociates, so above some 1800 K a real flame is colder.
 *
 * Returns: HL_OK, or the status of the air's or the gas's state
 */
HlStatus
hl_combustion_flame (const HlFuel *fuel, const HlFluid *air, const HlCombustion *combustion, double p, double T_air, HlState *flame)
{
  HlState fresh;
  HlStatus status = hl_fluid_state_pT (air, p, T_air, &fresh);
  if (status != HL_OK)
    return status;
  return hl_fluid_state_ph (combustion->gas, p, (fuel->h_formation + combustion->air * fresh.h) / combustion->gas_mass, flame);
}
