/* Water and steam by IAPWS-IF97: which region serves a pair (p,T).
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "fluid/water-private.h"

#include <math.h>

/**
 * hl_water_region3_pT:
 * @p: pressure [Pa]
 * @T: temperature [K]
 * @is_liquid: branch below the critical temperature
 * @state: (out): properties; phase is not set; untouched on failure
 *
 * The density starts from the backward equation v(p,T) of SR5-05 and is
 * iterated on region 3's own equation.
 *
 * Returns: HL_OK, or HL_NOT_CONVERGED
 */
HlStatus
hl_water_region3_pT (double p, double T, gboolean is_liquid, HlState *state)
{
  double density = 1.0 / hl_if97_v_pT_3 (hl_if97_subregion3 (p, T), p, T);
  if (T < HL_IF97_T_CRITICAL)
    density = is_liquid ? fmax (density, 1.001 * HL_IF97_D_CRITICAL) : fmin (density, 0.999 * HL_IF97_D_CRITICAL);
  HlStatus status = hl_if97_region3_density_pT (p, T, density, &density);
  if (status != HL_OK)
    return status;
  hl_if97_region3 (density, T, state);
  state->p = p;
  return HL_OK;
}

/* Region 3 at (p,T) with its phase; the line itself counts as liquid. */
static HlStatus
region3_with_phase (double p, double T, HlState *state)
{
  HlPhase phase = p > HL_IF97_P_CRITICAL ? HL_PHASE_SUPERCRITICAL : HL_PHASE_VAPOUR;
  if (T <= HL_IF97_T_CRITICAL && (p > HL_IF97_P_CRITICAL || p >= hl_if97_psat (T)))
    phase = HL_PHASE_LIQUID;
  HlStatus status = hl_water_region3_pT (p, T, phase == HL_PHASE_LIQUID, state);
  if (status == HL_OK)
    state->phase = phase;
  return status;
}

/**
 * hl_water_state_pT:
 * @fluid: water
 * @p: pressure [Pa]
 * @T: temperature [K]
 * @state: (out): the state; untouched on failure
 *
 * Regions as in IAPWS R7-97(2012), Figure 1; a pair on the saturation line is liquid.
 *
 * Returns: HL_OK, HL_OUTSIDE_RANGE, or HL_NOT_CONVERGED
 */
HlStatus
hl_water_state_pT (const HlFluid *fluid G_GNUC_UNUSED, double p, double T, HlState *state)
{
  if (!(p > 0.0 && p <= HL_IF97_P_MAX && T >= HL_IF97_T_MIN && T <= HL_IF97_T_MAX))
    return HL_OUTSIDE_RANGE;
  if (T <= HL_IF97_T_13 && (p > HL_IF97_P_SAT_13 || p >= hl_if97_psat (T)))
    {
      hl_if97_region1 (p, T, state);
      state->phase = HL_PHASE_LIQUID;
      return HL_OK;
    }
  if (T > HL_IF97_T_13 && p > HL_IF97_P_SAT_13 && T < hl_if97_B23_T (p))
    return region3_with_phase (p, T, state);
  if (T > HL_IF97_T_25 && p > HL_IF97_P_MAX_5)
    return HL_OUTSIDE_RANGE;
  if (T <= HL_IF97_T_25)
    hl_if97_region2 (p, T, state);
  else
    hl_if97_region5 (p, T, state);
  state->phase = p > HL_IF97_P_CRITICAL ? HL_PHASE_SUPERCRITICAL : HL_PHASE_VAPOUR;
  return HL_OK;
}

const HlFluid hl_water_if97 = {
  .id = "water",
  .name = "Water and steam",
  .formulation = "IAPWS-IF97, R7-97(2012)",
  /* R7-97(2012): ranges of Figure 1 (0 < p), critical point of section 2,
   * triple point of section 2 (611.657 Pa, 273.16 K); molar mass of section 2. */
  .limits = {
    .p_min = 0.0, .p_max = HL_IF97_P_MAX, .T_min = HL_IF97_T_MIN, .T_max = HL_IF97_T_MAX,
    .p_critical = HL_IF97_P_CRITICAL, .T_critical = HL_IF97_T_CRITICAL, .v_critical = 1.0 / HL_IF97_D_CRITICAL,
    .p_triple = 611.657, .T_triple = 273.16, .molar_mass = 18.015257e-3,
  },
  .data = NULL,
  .state_pT = hl_water_state_pT,
  .state_ph = hl_water_state_ph,
  .state_ps = hl_water_state_ps,
  .state_hs = hl_water_state_hs,
  .state_px = hl_water_state_px,
  .state_Tx = hl_water_state_Tx,
  .saturation_p = hl_water_saturation_p,
  .saturation_T = hl_water_saturation_T,
  .explain_failure = hl_water_explain_failure,
};
