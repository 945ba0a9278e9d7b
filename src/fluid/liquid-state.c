/* States of liquids whose density depends on temperature alone.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "fluid/liquid-private.h"

#include <math.h>

#define MAX_STEPS 100
#define SHIFT 100.0                   /* x = (T - 273.15)/SHIFT */

/* Gibbs energy g(p,T) = g0(T) + v(T) (p - p0): the only one for which v depends on T alone.
 * From it h = h0 + (v - T v') (p - p0), s = s0 - v' (p - p0), cp = cp0 - T v'' (p - p0). */
typedef struct { double v, v_T, v_TT, h, s, cp, h_p; } Values;

static double
integral_cp (const HlLiquid *liquid, double T)
{
  double x = (T - HL_LIQUID_T0) / SHIFT, sum = 0.0;
  for (guint i = liquid->cp.n; i-- > 0;)
    sum = (sum + liquid->cp.a[i] / (i + 1.0)) * x;
  return SHIFT * sum;
}

static double
integral_cp_over_T (const HlLiquid *liquid, double T)
{
  double sum = liquid->s_of_T[0] * log (T / HL_LIQUID_T0), power = 1.0, power0 = 1.0;
  for (guint i = 1; i < liquid->cp.n; i++)
    {
      power *= T;
      power0 *= HL_LIQUID_T0;
      sum += liquid->s_of_T[i] * (power - power0) / i;
    }
  return sum;
}

static void
values_at (const HlLiquid *liquid, double p, double T, Values *at)
{
  double x = (T - HL_LIQUID_T0) / SHIFT, d = 0.0, d_x = 0.0, d_xx = 0.0, over = p - HL_LIQUID_P0;
  for (guint i = liquid->density.n; i-- > 0;)
    {
      d_xx = d_xx * x + 2.0 * d_x;
      d_x = d_x * x + d;
      d = d * x + liquid->density.a[i];
    }
  double d_T = d_x / SHIFT, d_TT = d_xx / (SHIFT * SHIFT);
  at->v = 1.0 / d;
  at->v_T = -d_T / (d * d);
  at->v_TT = 2.0 * d_T * d_T / (d * d * d) - d_TT / (d * d);
  at->h_p = at->v - T * at->v_T;
  at->h = integral_cp (liquid, T) + at->h_p * over;
  at->s = integral_cp_over_T (liquid, T) - at->v_T * over;
  at->cp = hl_polynomial (&liquid->cp, x) - T * at->v_TT * over;
}

HlStatus
hl_liquid_state_pT (const HlFluid *fluid, double p, double T, HlState *state)
{
  const HlFluidLimits *limits = &fluid->limits;
  Values at;
  if (!(p > 0.0 && p <= limits->p_max && T >= limits->T_min && T <= limits->T_max))
    return HL_OUTSIDE_RANGE;
  values_at (hl_liquid_of (fluid), p, T, &at);
  double T_h = 1.0 / at.cp, T_p = -at.h_p / at.cp;
  *state = (HlState) {
    .p = p, .T = T, .h = at.h, .s = at.s, .v = at.v, .u = at.h - p * at.v,
    .cp = at.cp, .cv = NAN, .w = NAN, .x = NAN,      /* at constant volume it could not be heated */
    .T_p = T_p, .T_h = T_h, .s_p = -at.v / T, .s_h = 1.0 / T, .v_p = at.v_T * T_p, .v_h = at.v_T * T_h,
    .phase = HL_PHASE_LIQUID,
  };
  return HL_OK;
}

static HlStatus
from_p (const HlFluid *fluid, double p, gboolean is_entropy, double value, HlState *state)
{
  const HlLiquid *liquid = hl_liquid_of (fluid);
  double low = fluid->limits.T_min, high = fluid->limits.T_max, T = 0.5 * (low + high);
  Values cold, hot, at;
  if (!(p > 0.0 && p <= fluid->limits.p_max && isfinite (value)))
    return HL_OUTSIDE_RANGE;
  values_at (liquid, p, low, &cold);
  values_at (liquid, p, high, &hot);
  double slack = 1e-12 * hot.cp * (is_entropy ? 1.0 : high);
  if (!(value >= (is_entropy ? cold.s : cold.h) - slack && value <= (is_entropy ? hot.s : hot.h) + slack))
    return HL_OUTSIDE_RANGE;
  for (int i = 0; i < MAX_STEPS; i++)
    {
      values_at (liquid, p, T, &at);
      double miss = value - (is_entropy ? at.s : at.h), next = T + miss / at.cp * (is_entropy ? T : 1.0);
      *(miss > 0.0 ? &low : &high) = T;
      if (!(next >= low && next <= high))
        next = 0.5 * (low + high);
      double step = fabs (next - T);
      T = next;
      if (step <= 1e-14 * T)
        break;
    }
  HlStatus status = hl_liquid_state_pT (fluid, p, T, state);
  if (status == HL_OK)
    *(is_entropy ? &state->s : &state->h) = value;
  return status;
}

HlStatus
hl_liquid_state_ph (const HlFluid *fluid, double p, double h, HlState *state)
{
  return from_p (fluid, p, FALSE, h, state);
}

HlStatus
hl_liquid_state_ps (const HlFluid *fluid, double p, double s, HlState *state)
{
  return from_p (fluid, p, TRUE, s, state);
}

/* At constant enthalpy the entropy falls with pressure as v/T does, which hardly changes. */
HlStatus
hl_liquid_state_hs (const HlFluid *fluid, double h, double s, HlState *state)
{
  double low = 0.0, high = fluid->limits.p_max, p = HL_LIQUID_P0;
  HlState here;
  if (!isfinite (h) || !isfinite (s))
    return HL_OUTSIDE_RANGE;
  for (int i = 0; i < MAX_STEPS && high > low; i++)
    {
      /* More pressure takes the place of warmth: off the cold end there is too much of it, off the hot end too little. */
      if (from_p (fluid, p, FALSE, h, &here) != HL_OK)
        {
          Values hot;
          values_at (hl_liquid_of (fluid), p, fluid->limits.T_max, &hot);
          *(h > hot.h ? &low : &high) = p;
          p = 0.5 * (low + high);
          continue;
        }
      double miss = s - here.s, next = p + miss / here.s_p;
      *(miss > 0.0 ? &high : &low) = p;
      if (fabs (next - p) <= 1e-6 + 1e-11 * p)
        {
          if (!(next > 0.0 && next <= fluid->limits.p_max))
            return HL_OUTSIDE_RANGE;
          *state = here;
          state->s = s;
          return HL_OK;
        }
      p = next > low && next <= high ? next : 0.5 * (low + high);
    }
  return HL_OUTSIDE_RANGE;
}

double
hl_liquid_viscosity (const HlLiquid *liquid, double T)
{
  return exp (hl_polynomial (&liquid->ln_viscosity, 1000.0 / T));
}

double
hl_liquid_conductivity (const HlLiquid *liquid, double T)
{
  return hl_polynomial (&liquid->conductivity, (T - HL_LIQUID_T0) / SHIFT);
}
