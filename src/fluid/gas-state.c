/* States of gas mixtures by every pair that makes sense for them.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "fluid/gas-private.h"

#include <math.h>

#include "fluid/if97-private.h"

#define MAX_STEPS 100
#define LN_P_STEP 0.1

static void
dry_state (const HlGas *gas, double p, double T, HlState *state)
{
  double h = hl_gas_h (&gas->whole, T), cp = hl_gas_cp (&gas->whole, T), R = gas->R, v = R * T / p;
  *state = (HlState) {
    .p = p, .T = T, .h = h, .s = hl_gas_s (&gas->whole, T, log (T)) - R * log (p / HL_GAS_P0), .v = v, .u = h - R * T,
    .cp = cp, .cv = cp - R, .w = sqrt (cp / (cp - R) * R * T), .x = NAN,
    .T_p = 0.0, .T_h = 1.0 / cp, .s_p = -R / p, .s_h = 1.0 / T, .v_p = -v / p, .v_h = R / (p * cp),
    .phase = HL_PHASE_GAS,
  };
}

static gboolean
has_pressure (double p)
{
  return p > 0.0 && p <= HL_GAS_P_MAX;
}

/* The pressure is checked. */
static HlStatus
state_at (const HlGas *gas, double p, double T, HlState *state)
{
  if (!(T >= gas->fluid.limits.T_min && T <= gas->fluid.limits.T_max) || hl_gas_is_icy (gas, p, T))
    return HL_OUTSIDE_RANGE;
  if (hl_gas_is_wet (gas, p, T))
    hl_gas_wet_state (gas, p, T, state);
  else
    dry_state (gas, p, T, state);
  return HL_OK;
}

HlStatus
hl_gas_state_pT (const HlFluid *fluid, double p, double T, HlState *state)
{
  return has_pressure (p) ? state_at (hl_gas_of (fluid), p, T, state) : HL_OUTSIDE_RANGE;
}

/* Enthalpy or entropy at one pressure, and its slope in T; both rise with T. */
typedef struct {
  const HlGas *gas;
  double       p, minus_R_ln_p;
  gboolean     is_entropy, is_wet;
} Search;

static double
value_at (const Search *search, double T, double *slope)
{
  HlGasWet wet;
  if (search->is_wet)
    {
      hl_gas_wet_values (search->gas, search->p, T, &wet);
      *slope = search->is_entropy ? wet.s_T : wet.h_T;
      return search->is_entropy ? wet.s : wet.h;
    }
  *slope = hl_gas_cp (&search->gas->whole, T);
  if (!search->is_entropy)
    return hl_gas_h (&search->gas->whole, T);
  *slope /= T;
  return hl_gas_s (&search->gas->whole, T, log (T)) + search->minus_R_ln_p;
}

/* Newton between bounds that close in; FALSE where the value lies beyond them. */
static gboolean
temperature_of (const Search *search, double value, double low, double high, double start, double *T_found)
{
  double T = CLAMP (start, low, high), slope, miss = 0.0;
  for (int i = 0; i < MAX_STEPS; i++)
    {
      miss = value - value_at (search, T, &slope);
      if (miss > 0.0)
        low = T;
      else
        high = T;
      double next = T + miss / slope;
      if (!(next >= low && next <= high))
        next = 0.5 * (low + high);
      double step = fabs (next - T);
      T = next;
      if (step <= 1e-14 * T)
        break;
    }
  *T_found = T;
  return isfinite (miss);
}

static gboolean
is_beyond (const Search *search, double value, double low, double high)
{
  double slope, least = value_at (search, low, &slope), most = value_at (search, high, &slope);
  double slack = 1e-12 * fabs (slope * high);       /* the ends themselves belong to the range */
  return !(value >= least - slack && value <= most + slack);
}

/* First as if all water were vapour; where that temperature lies below the dew
 * point, with the liquid: both agree at the dew point and rise with T. */
static HlStatus
from_p (const HlGas *gas, double p, gboolean is_entropy, double value, HlState *state)
{
  const HlFluidLimits *limits = &gas->fluid.limits;
  Search search = { .gas = gas, .p = p, .minus_R_ln_p = is_entropy ? -gas->R * log (p / HL_GAS_P0) : 0.0, .is_entropy = is_entropy };
  double T, slope, start = 600.0;
  if (!has_pressure (p) || !isfinite (value))
    return HL_OUTSIDE_RANGE;
  double low = limits->T_min, dew = gas->y_water > 0.0 ? hl_gas_dew_T (gas, p) : 0.0;
  if (dew > HL_GAS_T_ICE && dew > low && value < value_at (&search, dew, &slope))
    {
      search.is_wet = TRUE;
      low = fmax (low, HL_GAS_T_ICE);
      start = 0.5 * (low + dew);
      if (is_beyond (&search, value, low, dew) || !temperature_of (&search, value, low, dew, start, &T))
        return HL_OUTSIDE_RANGE;
    }
  else if (is_beyond (&search, value, low, limits->T_max) || !temperature_of (&search, value, low, limits->T_max, start, &T))
    return HL_OUTSIDE_RANGE;
  HlStatus status = state_at (gas, p, T, state);
  if (status == HL_OK)
    *(is_entropy ? &state->s : &state->h) = value;
  return status;
}

HlStatus
hl_gas_state_ph (const HlFluid *fluid, double p, double h, HlState *state)
{
  return from_p (hl_gas_of (fluid), p, FALSE, h, state);
}

HlStatus
hl_gas_state_ps (const HlFluid *fluid, double p, double s, HlState *state)
{
  return from_p (hl_gas_of (fluid), p, TRUE, s, state);
}

static HlStatus
at_ln_p (const HlGas *gas, double ln_p, double h, HlState *state)
{
  return from_p (gas, fmin (exp (ln_p), HL_GAS_P_MAX), FALSE, h, state);
}

/* Entropy falls with pressure at constant enthalpy.  No dry state has this pair.
 * The pressures at which the water does not freeze are one stretch: with less,
 * more of it evaporates and cools the rest, with more, the work on the liquid
 * takes the place of warmth. */
static HlStatus
wet_from_hs (const HlGas *gas, double h, double s, HlState *state)
{
  double low = log (hl_if97_psat (HL_GAS_T_ICE) / gas->y_water), high = log (HL_GAS_P_MAX), ln_p = high, inside;
  HlState here;
  while (at_ln_p (gas, ln_p, h, &here) != HL_OK)
    if ((ln_p -= LN_P_STEP) < low)
      return HL_OUTSIDE_RANGE;
  inside = ln_p;
  for (int i = 0; i < MAX_STEPS && high - low > 4e-16 * fmax (1.0, fabs (high)); i++)
    {
      double next = NAN;
      if (at_ln_p (gas, ln_p, h, &here) != HL_OK)
        *(ln_p > inside ? &high : &low) = ln_p;
      else
        {
          double miss = s - here.s;
          *(miss > 0.0 ? &high : &low) = inside = ln_p;
          next = ln_p + miss / (here.s_p * here.p);
          if (fabs (next - ln_p) <= 1e-12)
            {
              *state = here;
              state->s = s;
              return HL_OK;
            }
        }
      ln_p = next >= low && next <= high ? next : 0.5 * (low + high);
    }
  return HL_OUTSIDE_RANGE;
}

HlStatus
hl_gas_state_hs (const HlFluid *fluid, double h, double s, HlState *state)
{
  const HlGas *gas = hl_gas_of (fluid);
  const HlFluidLimits *limits = &fluid->limits;
  Search search = { .gas = gas };
  double T, p;
  HlStatus status = HL_OUTSIDE_RANGE;
  if (!isfinite (h) || !isfinite (s))
    return HL_OUTSIDE_RANGE;
  if (!is_beyond (&search, h, limits->T_min, limits->T_max) && temperature_of (&search, h, limits->T_min, limits->T_max, 600.0, &T))
    {
      p = HL_GAS_P0 * exp ((hl_gas_s (&gas->whole, T, log (T)) - s) / gas->R);
      if (has_pressure (p) && !hl_gas_is_wet (gas, p, T))
        status = state_at (gas, p, T, state);
    }
  if (status == HL_OK)
    {
      state->h = h;
      state->s = s;
      return HL_OK;
    }
  return gas->y_water > 0.0 ? wet_from_hs (gas, h, s, state) : HL_OUTSIDE_RANGE;
}

HlStatus
hl_gas_state_dT (const HlFluid *fluid, double density, double T, HlState *state)
{
  const HlGas *gas = hl_gas_of (fluid);
  double p = density * gas->R * T;
  if (has_pressure (p) && !hl_gas_is_wet (gas, p, T))
    return state_at (gas, p, T, state);
  return gas->y_water > 0.0 ? hl_density_by_pressure (fluid, density, T, state) : HL_OUTSIDE_RANGE;
}
