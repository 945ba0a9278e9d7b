/* What is common to all fluids: the list of them, the calls that lead to each, names of statuses and phases.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "fluid/fluid-private.h"

#include <math.h>
#include <string.h>

#include "fluid/gas-private.h"
#include "fluid/liquid-private.h"

static const HlFluid *const fluids[] = { &hl_water_if97 };

/**
 * hl_fluid_lookup:
 * @id: short name of a fluid, such as "water" or "isopentane"; for another zero
 *   of enthalpy and entropy with "@IIR", "@NBP" or "@ASHRAE" after it; a gas by
 *   its mole fractions, see gas.h
 *
 * The first look-up of a medium reads its coefficients and takes some milliseconds;
 * every later one finds it in a table.
 *
 * Returns: (nullable): the fluid, or NULL where none has this id
 */
const HlFluid *
hl_fluid_lookup (const char *id)
{
  return id != NULL ? hl_fluid_find (id, NULL) : NULL;
}

/**
 * hl_fluid_find:
 * @id: as for hl_fluid_lookup()
 * @error: says why no medium has this id, and what is known instead
 *
 * Returns: (nullable): the fluid; NULL with @error set
 */
const HlFluid *
hl_fluid_find (const char *id, GError **error)
{
  g_autoptr (GError) why = NULL;
  g_return_val_if_fail (id != NULL, NULL);
  for (gsize i = 0; i < G_N_ELEMENTS (fluids); i++)
    if (strcmp (id, fluids[i]->id) == 0)
      return fluids[i];
  const HlFluid *fluid = hl_gas_lookup (id, &why);
  if (fluid == NULL && why == NULL)
    fluid = hl_liquid_lookup (id);
  if (fluid == NULL && why == NULL)
    fluid = hl_registry_lookup (id);
  if (fluid == NULL && why != NULL)
    g_propagate_error (error, g_steal_pointer (&why));
  else if (fluid == NULL)
    g_set_error (error, HL_FLUID_ERROR, HL_FLUID_ERROR_ID, "no medium has the id \"%s\"", id);
  return fluid;
}

/**
 * hl_fluid_water:
 *
 * Returns: water and steam by IAPWS-IF97, R7-97(2012)
 */
const HlFluid *
hl_fluid_water (void)
{
  return &hl_water_if97;
}

/**
 * hl_fluid_id:
 * @fluid: a fluid
 *
 * Returns: the id by which hl_fluid_lookup() finds it
 */
const char *
hl_fluid_id (const HlFluid *fluid)
{
  return fluid->id;
}

/**
 * hl_fluid_name:
 * @fluid: a fluid
 *
 * Returns: its English name
 */
const char *
hl_fluid_name (const HlFluid *fluid)
{
  return fluid->name;
}

/**
 * hl_fluid_formulation:
 * @fluid: a fluid
 *
 * Returns: name of the formulation and its release
 */
const char *
hl_fluid_formulation (const HlFluid *fluid)
{
  return fluid->formulation;
}

/**
 * hl_fluid_limits:
 * @fluid: a fluid
 * @limits: (out): outer box of the published range and fixed points, SI; a
 *   p_min of 0 means that every pressure above 0 is allowed
 */
void
hl_fluid_limits (const HlFluid *fluid, HlFluidLimits *limits)
{
  *limits = fluid->limits;
}

/**
 * hl_fluid_has_dome:
 * @fluid: a fluid
 *
 * Returns: whether it has a saturation line that ends at a critical point; ideal
 *   gases and liquids by polynomials have none: the critical data of their limits
 *   are NaN and saturation calls fail
 */
gboolean
hl_fluid_has_dome (const HlFluid *fluid)
{
  return !isnan (fluid->limits.T_critical);
}

/**
 * hl_status_describe:
 * @status: a status
 *
 * Returns: what it means, in a few English words
 */
const char *
hl_status_describe (HlStatus status)
{
  switch (status)
    {
    case HL_OK: return "ok";
    case HL_OUTSIDE_RANGE: return "outside the published range of the fluid";
    case HL_NOT_CONVERGED: return "the iteration did not converge";
    }
  return "unknown status";
}

/**
 * hl_phase_name:
 * @phase: a phase
 *
 * Returns: its English name
 */
const char *
hl_phase_name (HlPhase phase)
{
  switch (phase)
    {
    case HL_PHASE_LIQUID: return "liquid";
    case HL_PHASE_TWO_PHASE: return "two-phase";
    case HL_PHASE_VAPOUR: return "vapour";
    case HL_PHASE_SUPERCRITICAL: return "supercritical";
    case HL_PHASE_GAS: return "gas";
    }
  return "unknown";
}

/**
 * hl_fluid_state_pT:
 * @fluid: a fluid
 * @p: pressure [Pa]
 * @T: temperature [K]
 * @state: (out): the complete state; untouched on failure
 *
 * Returns: HL_OK; HL_OUTSIDE_RANGE where the pair lies outside the published
 *   range or is no number; HL_NOT_CONVERGED
 */
HlStatus
hl_fluid_state_pT (const HlFluid *fluid, double p, double T, HlState *state)
{
  return fluid->state_pT (fluid, p, T, state);
}

/**
 * hl_fluid_state_ph:
 * @fluid: a fluid
 * @p: pressure [Pa]
 * @h: specific enthalpy [J/kg]
 * @state: (out): the complete state; untouched on failure
 *
 * Returns: HL_OK; HL_OUTSIDE_RANGE where the pair lies outside the published
 *   range or is no number; HL_NOT_CONVERGED
 */
HlStatus
hl_fluid_state_ph (const HlFluid *fluid, double p, double h, HlState *state)
{
  return fluid->state_ph (fluid, p, h, state);
}

/**
 * hl_fluid_state_ps:
 * @fluid: a fluid
 * @p: pressure [Pa]
 * @s: specific entropy [J/(kg K)]
 * @state: (out): the complete state; untouched on failure
 *
 * Returns: HL_OK; HL_OUTSIDE_RANGE where the pair lies outside the published
 *   range or is no number; HL_NOT_CONVERGED
 */
HlStatus
hl_fluid_state_ps (const HlFluid *fluid, double p, double s, HlState *state)
{
  return fluid->state_ps (fluid, p, s, state);
}

/**
 * hl_fluid_state_hs:
 * @fluid: a fluid
 * @h: specific enthalpy [J/kg]
 * @s: specific entropy [J/(kg K)]
 * @state: (out): the complete state; untouched on failure
 *
 * Returns: HL_OK; HL_OUTSIDE_RANGE where the pair lies outside the published
 *   range or is no number; HL_NOT_CONVERGED
 */
HlStatus
hl_fluid_state_hs (const HlFluid *fluid, double h, double s, HlState *state)
{
  return fluid->state_hs (fluid, h, s, state);
}

/**
 * hl_fluid_state_px:
 * @fluid: a fluid
 * @p: pressure [Pa]
 * @x: vapour mass fraction [-]
 * @state: (out): the complete state; untouched on failure
 *
 * Returns: HL_OK; HL_OUTSIDE_RANGE where the pair lies outside the published
 *   range or is no number; HL_NOT_CONVERGED
 */
HlStatus
hl_fluid_state_px (const HlFluid *fluid, double p, double x, HlState *state)
{
  return fluid->state_px (fluid, p, x, state);
}

/**
 * hl_fluid_state_Tx:
 * @fluid: a fluid
 * @T: temperature [K]
 * @x: vapour mass fraction [-]
 * @state: (out): the complete state; untouched on failure
 *
 * Returns: HL_OK; HL_OUTSIDE_RANGE where the pair lies outside the published
 *   range or is no number; HL_NOT_CONVERGED
 */
HlStatus
hl_fluid_state_Tx (const HlFluid *fluid, double T, double x, HlState *state)
{
  return fluid->state_Tx (fluid, T, x, state);
}

/**
 * hl_fluid_state_dT:
 * @fluid: a fluid
 * @density: [kg/m3]
 * @T: temperature [K]
 * @state: (out): the complete state; untouched on failure
 *
 * Returns: HL_OK; HL_OUTSIDE_RANGE where the pair lies outside the published
 *   range or is no number; HL_NOT_CONVERGED
 */
HlStatus
hl_fluid_state_dT (const HlFluid *fluid, double density, double T, HlState *state)
{
  if (fluid->state_dT == NULL)
    return hl_density_by_pressure (fluid, density, T, state);
  return fluid->state_dT (fluid, density, T, state);
}

/**
 * hl_fluid_saturation_p:
 * @fluid: a fluid
 * @p: pressure [Pa]
 * @saturation: (out): both ends of the line and their slopes along it; untouched on failure
 *
 * Returns: HL_OK; HL_OUTSIDE_RANGE off the line's range; HL_NOT_CONVERGED
 */
HlStatus
hl_fluid_saturation_p (const HlFluid *fluid, double p, HlSaturation *saturation)
{
  return fluid->saturation_p (fluid, p, saturation);
}

/**
 * hl_fluid_saturation_T:
 * @fluid: a fluid
 * @T: temperature [K]
 * @saturation: (out): both ends of the line and their slopes along it; untouched on failure
 *
 * Returns: HL_OK; HL_OUTSIDE_RANGE off the line's range; HL_NOT_CONVERGED
 */
HlStatus
hl_fluid_saturation_T (const HlFluid *fluid, double T, HlSaturation *saturation)
{
  return fluid->saturation_T (fluid, T, saturation);
}

/**
 * hl_fluid_explain_failure:
 * @fluid: a fluid
 * @status: what the call returned
 * @pair: "pT", "ph", "ps", "hs", "px", "Tx" or "dT"
 * @a: first argument of the call, SI
 * @b: second argument of the call, SI
 *
 * Returns: (transfer full): a sentence that names the limit which was broken
 */
char *
hl_fluid_explain_failure (const HlFluid *fluid, HlStatus status, const char *pair, double a, double b)
{
  return fluid->explain_failure (fluid, status, pair, a, b);
}
