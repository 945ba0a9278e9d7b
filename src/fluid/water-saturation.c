/* Water and steam on the saturation line and between its ends.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "fluid/water-private.h"

#include <math.h>

/* IAPWS SR5-05(2016), Tables 2 and 10, read along the line: subregions that
 * touch it, up to each pressure. */
static char
subregion_of_saturated (double p, gboolean is_liquid)
{
  if (is_liquid)
    return p <= 19.00881189173929e6 ? 'c' : p <= 21.04336732e6 ? 's' : p <= 21.93161551e6 ? 'u' : 'y';
  return p <= 20.5e6 ? 't' : p <= 21.04336732e6 ? 'r' : p <= 21.90096265e6 ? 'x' : 'z';
}

/* Within 2e-5 K of the critical point psat of Eq. 30 lies up to 3e-11 above
 * what region 3's isotherm reaches; there the root search ends on the density
 * where the isotherm is flat, at the critical point itself on that point. */
static HlStatus
saturated_region3 (double p, double T, gboolean is_liquid, HlState *state)
{
  double density = HL_IF97_D_CRITICAL;
  if (p < HL_IF97_P_CRITICAL)
    {
      density = 1.0 / hl_if97_v_pT_3 (subregion_of_saturated (p, is_liquid), p, T);
      density = is_liquid ? fmax (density, 1.001 * HL_IF97_D_CRITICAL) : fmin (density, 0.999 * HL_IF97_D_CRITICAL);
      HlStatus status = hl_if97_region3_density_pT (p, T, density, &density);
      if (status != HL_OK)
        return status;
    }
  hl_if97_region3 (density, T, state);
  state->p = p;
  return HL_OK;
}

HlStatus
hl_water_saturated_ends (double p, double T, HlState *liquid, HlState *vapour)
{
  if (T <= HL_IF97_T_13)
    {
      hl_if97_region1 (p, T, liquid);
      hl_if97_region2 (p, T, vapour);
    }
  else
    {
      HlStatus status;
      if ((status = saturated_region3 (p, T, TRUE, liquid)) != HL_OK
          || (status = saturated_region3 (p, T, FALSE, vapour)) != HL_OK)
        return status;
    }
  liquid->phase = HL_PHASE_LIQUID;
  vapour->phase = HL_PHASE_VAPOUR;
  return HL_OK;
}

void
hl_water_saturation_from_ends (const HlState *liquid, const HlState *vapour, double T_p, HlSaturation *saturation)
{
  /* Along the line dT = T_p(h) dp + T_h dh, so dh/dp follows from both slopes of T. */
  double h_liquid_p = (T_p - liquid->T_p) / liquid->T_h;
  double h_vapour_p = (T_p - vapour->T_p) / vapour->T_h;
  *saturation = (HlSaturation) {
    .p = liquid->p, .T = liquid->T, .T_p = T_p,
    .h_liquid = liquid->h, .s_liquid = liquid->s, .v_liquid = liquid->v,
    .h_vapour = vapour->h, .s_vapour = vapour->s, .v_vapour = vapour->v,
    .h_liquid_p = h_liquid_p, .h_vapour_p = h_vapour_p,
    .s_liquid_p = liquid->s_p + liquid->s_h * h_liquid_p,
    .s_vapour_p = vapour->s_p + vapour->s_h * h_vapour_p,
    .v_liquid_p = liquid->v_p + liquid->v_h * h_liquid_p,
    .v_vapour_p = vapour->v_p + vapour->v_h * h_vapour_p,
  };
}

/* Derivatives are those of the mixture formula itself, which differ from
 * s_h = 1/T and s_p = -v/T by the small mismatch (about 1e-5) of Gibbs
 * energies on IF97's saturation line. */
void
hl_water_mix (const HlSaturation *saturation, double x, HlState *state)
{
  const HlSaturation *sat = saturation;
  double h_span = sat->h_vapour - sat->h_liquid, s_span = sat->s_vapour - sat->s_liquid;
  double v_span = sat->v_vapour - sat->v_liquid;
  double per_h_span = 1.0 / h_span, y = 1.0 - x;
  double x_p = -(y * sat->h_liquid_p + x * sat->h_vapour_p) * per_h_span;
  state->p = sat->p;
  state->T = sat->T;
  state->h = sat->h_liquid + x * h_span;
  state->s = sat->s_liquid + x * s_span;
  state->v = sat->v_liquid + x * v_span;
  state->u = state->h - sat->p * state->v;
  state->cp = state->cv = state->w = NAN;
  state->x = x;
  state->T_p = sat->T_p;
  state->T_h = 0.0;
  state->s_p = y * sat->s_liquid_p + x * sat->s_vapour_p + s_span * x_p;
  state->s_h = s_span * per_h_span;
  state->v_p = y * sat->v_liquid_p + x * sat->v_vapour_p + v_span * x_p;
  state->v_h = v_span * per_h_span;
  state->phase = HL_PHASE_TWO_PHASE;
}

static HlStatus
saturation_at (double p, double T, HlSaturation *saturation)
{
  HlState liquid, vapour;
  HlStatus status = hl_water_saturated_ends (p, T, &liquid, &vapour);
  if (status != HL_OK)
    return status;
  double p_T;
  hl_if97_psat_T (T, &p_T);
  hl_water_saturation_from_ends (&liquid, &vapour, 1.0 / p_T, saturation);
  return HL_OK;
}

/* The ends themselves are given whole, as saturated liquid and vapour; at the
 * critical point they are one and there is nothing to mix. */
static HlStatus
state_at (double p, double T, double x, HlState *state)
{
  HlState liquid, vapour;
  HlStatus status = hl_water_saturated_ends (p, T, &liquid, &vapour);
  if (status != HL_OK)
    return status;
  if (x > 0.0 && x < 1.0 && vapour.h > liquid.h)
    {
      HlSaturation saturation;
      double p_T;
      hl_if97_psat_T (T, &p_T);
      hl_water_saturation_from_ends (&liquid, &vapour, 1.0 / p_T, &saturation);
      hl_water_mix (&saturation, x, state);
      return HL_OK;
    }
  *state = x > 0.0 ? vapour : liquid;
  state->x = x;
  return HL_OK;
}

/**
 * hl_water_saturation_p:
 * @fluid: water
 * @p: pressure [Pa], 611.213 to 22.064e6
 * @saturation: (out): both ends of the line; untouched on failure
 *
 * Regions 1 and 2 up to 623.15 K, region 3 solved at p3(density, Tsat) = p above.
 *
 * Returns: HL_OK, HL_OUTSIDE_RANGE, or HL_NOT_CONVERGED
 */
HlStatus
hl_water_saturation_p (const HlFluid *fluid G_GNUC_UNUSED, double p, HlSaturation *saturation)
{
  if (!(p >= HL_IF97_P_MIN_SAT && p <= HL_IF97_P_CRITICAL))
    return HL_OUTSIDE_RANGE;
  return saturation_at (p, hl_if97_Tsat (p), saturation);
}

/**
 * hl_water_saturation_T:
 * @fluid: water
 * @T: temperature [K], 273.15 to 647.096
 * @saturation: (out): both ends of the line; untouched on failure
 *
 * Returns: HL_OK, HL_OUTSIDE_RANGE, or HL_NOT_CONVERGED
 */
HlStatus
hl_water_saturation_T (const HlFluid *fluid G_GNUC_UNUSED, double T, HlSaturation *saturation)
{
  if (!(T >= HL_IF97_T_MIN && T <= HL_IF97_T_CRITICAL))
    return HL_OUTSIDE_RANGE;
  return saturation_at (hl_if97_psat (T), T, saturation);
}

/**
 * hl_water_state_px:
 * @fluid: water
 * @p: pressure [Pa], 611.213 to 22.064e6
 * @x: vapour mass fraction [-], 0 to 1
 * @state: (out): the state; untouched on failure
 *
 * At x = 0 and x = 1 the state is the saturated liquid or vapour with all of
 * its single-phase properties and derivatives.
 *
 * Returns: HL_OK, HL_OUTSIDE_RANGE, or HL_NOT_CONVERGED
 */
HlStatus
hl_water_state_px (const HlFluid *fluid G_GNUC_UNUSED, double p, double x, HlState *state)
{
  if (!(p >= HL_IF97_P_MIN_SAT && p <= HL_IF97_P_CRITICAL && x >= 0.0 && x <= 1.0))
    return HL_OUTSIDE_RANGE;
  return state_at (p, hl_if97_Tsat (p), x, state);
}

/**
 * hl_water_state_Tx:
 * @fluid: water
 * @T: temperature [K], 273.15 to 647.096
 * @x: vapour mass fraction [-], 0 to 1
 * @state: (out): the state; untouched on failure
 *
 * As hl_water_state_px(), at the saturation pressure of T.
 *
 * Returns: HL_OK, HL_OUTSIDE_RANGE, or HL_NOT_CONVERGED
 */
HlStatus
hl_water_state_Tx (const HlFluid *fluid G_GNUC_UNUSED, double T, double x, HlState *state)
{
  if (!(T >= HL_IF97_T_MIN && T <= HL_IF97_T_CRITICAL && x >= 0.0 && x <= 1.0))
    return HL_OUTSIDE_RANGE;
  return state_at (hl_if97_psat (T), T, x, state);
}
