/* Water and steam from pressure and enthalpy or entropy: region, starting value, polish.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "fluid/if97-sum.h"
#include "fluid/water-private.h"

#include <math.h>

/* The second argument of the pair; every function that takes it is inlined
 * with a constant, so that (p,h) and (p,s) are two programs from one text. */
typedef enum { KEY_H, KEY_S } Key;

typedef void (*Caloric) (double p, double T, HlIf97Caloric *caloric);
typedef void (*Region) (double p, double T, HlState *state);

#define MOST_STEPS 40

/* A temperature this near a limit counts as on it: the rounding of h and s
 * must not put a state outside that (p,T) has put on the limit. */
#define T_SLACK 1e-9

HL_IF97_INLINE double
key_of (Key key, const HlState *state)
{
  return key == KEY_H ? state->h : state->s;
}

/* T at given p where the key has the value, to third order: after a step from
 * within 30 mK about 1e-9 K are left, and finish() takes these. */
HL_IF97_INLINE HlStatus
solve_T (Caloric region, Key key, double p, double value, double T_low, double T_high, double *T)
{
  for (int i = 0; i < MOST_STEPS; i++)
    {
      HlIf97Caloric c;
      region (p, *T, &c);
      double slope = key == KEY_H ? c.cp : c.cp / *T;
      double slope_T = key == KEY_H ? c.cp_T : (c.cp_T - slope) / *T;
      double d = (value - (key == KEY_H ? c.h : c.s)) / slope;
      double bend = 0.5 * slope_T / slope * d;
      double next = *T + (fabs (bend) < 0.3 ? d * (1.0 - bend + 2.0 * bend * bend) : d);
      if (fabs (d) < 0.03)
        {
          *T = next;
          return HL_OK;
        }
      /* Two steps in a row against the same limit: the value lies beyond it. */
      if ((next >= T_high && *T >= T_high) || (next <= T_low && *T <= T_low))
        return HL_OUTSIDE_RANGE;
      *T = fmin (fmax (next, T_low), T_high);
    }
  return HL_NOT_CONVERGED;
}

/* Moves a state by the little that is left between its key and the value. */
HL_IF97_INLINE void
finish (Key key, double value, HlState *state)
{
  double step_h = key == KEY_H ? value - state->h : (value - state->s) * state->T;
  state->T += state->T_h * step_h;
  state->s += state->s_h * step_h;
  state->v += state->v_h * step_h;
  state->h += step_h;
  if (key == KEY_H)
    state->h = value;
  else
    state->s = value;
  state->u = state->h - state->p * state->v;
}

/* Where two regions meet with a small jump, no state has the value: the
 * answer is the boundary's temperature, and between the two sides' properties
 * in the proportion in which the value lies between theirs. */
static void
blend (Key key, double value, const HlState *below, const HlState *above, HlState *state)
{
  double k_below = key == KEY_H ? below->h : below->s, k_above = key == KEY_H ? above->h : above->s;
  double f = k_above > k_below ? fmin (fmax ((value - k_below) / (k_above - k_below), 0.0), 1.0) : 0.0;
  double g = 1.0 - f;
  *state = *below;
  state->h = g * below->h + f * above->h;
  state->s = g * below->s + f * above->s;
  state->v = g * below->v + f * above->v;
  state->u = g * below->u + f * above->u;
  state->cp = g * below->cp + f * above->cp;
  state->cv = g * below->cv + f * above->cv;
  state->w = g * below->w + f * above->w;
  state->T_p = g * below->T_p + f * above->T_p;
  state->T_h = g * below->T_h + f * above->T_h;
  state->s_p = g * below->s_p + f * above->s_p;
  state->v_p = g * below->v_p + f * above->v_p;
  state->v_h = g * below->v_h + f * above->v_h;
}

HL_IF97_INLINE HlStatus
solve_region1 (Key key, double p, double value, HlState *state)
{
  double T = key == KEY_H ? hl_if97_T_ph_1 (p, value) : hl_if97_T_ps_1 (p, value);
  T = fmin (fmax (T, HL_IF97_T_MIN), HL_IF97_T_13);
  HlStatus status = solve_T (hl_if97_region1_caloric, key, p, value, HL_IF97_T_MIN - 5.0, HL_IF97_T_13 + 5.0, &T);
  if (status != HL_OK)
    return status;
  if (T < HL_IF97_T_MIN * (1.0 - T_SLACK))
    return HL_OUTSIDE_RANGE;
  hl_if97_region1 (p, T, state);
  finish (key, value, state);
  state->phase = HL_PHASE_LIQUID;
  return HL_OK;
}

HL_IF97_INLINE double
start_region2 (Key key, double p, double value)
{
  /* The backward equations hold from psat(273.15 K) up; below, steam is an
   * ideal gas: h depends on T alone, s on ln p besides. */
  if (p < HL_IF97_P_MIN_SAT)
    {
      if (key == KEY_S)
        value += HL_IF97_R * log (p / HL_IF97_P_MIN_SAT);
      p = HL_IF97_P_MIN_SAT;
    }
  if (p <= 4e6)
    return key == KEY_H ? hl_if97_T_ph_2a (p, value) : hl_if97_T_ps_2a (p, value);
  if (key == KEY_H ? p < 6.546699678e6 || value >= hl_if97_B2bc_h (p) : value >= 5850.0)
    return key == KEY_H ? hl_if97_T_ph_2b (p, value) : hl_if97_T_ps_2b (p, value);
  return key == KEY_H ? hl_if97_T_ph_2c (p, value) : hl_if97_T_ps_2c (p, value);
}

/* Region 5, or the boundary with region 2 at 1073.15 K. */
static HlStatus
solve_region5 (Key key, double p, double value, HlState *state)
{
  double T = 1500.0;
  if (p > HL_IF97_P_MAX_5)
    return HL_OUTSIDE_RANGE;
  HlStatus status = key == KEY_H
    ? solve_T (hl_if97_region5_caloric, KEY_H, p, value, HL_IF97_T_25 - 50.0, HL_IF97_T_MAX + 50.0, &T)
    : solve_T (hl_if97_region5_caloric, KEY_S, p, value, HL_IF97_T_25 - 50.0, HL_IF97_T_MAX + 50.0, &T);
  if (status != HL_OK)
    return status;
  if (T > HL_IF97_T_MAX * (1.0 + T_SLACK))
    return HL_OUTSIDE_RANGE;
  if (T > HL_IF97_T_25)
    {
      hl_if97_region5 (p, T, state);
      finish (key, value, state);
      return HL_OK;
    }
  HlState below, above;
  hl_if97_region2 (p, HL_IF97_T_25, &below);
  hl_if97_region5 (p, HL_IF97_T_25, &above);
  blend (key, value, &below, &above, state);
  return HL_OK;
}

/* Steam of region 2 or 5; T_low is where region 2 begins at this pressure. */
HL_IF97_INLINE HlStatus
solve_steam (Key key, double p, double value, double T_low, HlState *state)
{
  double T = fmin (fmax (start_region2 (key, p, value), T_low), HL_IF97_T_25);
  HlStatus status = solve_T (hl_if97_region2_caloric, key, p, value, T_low - 5.0, HL_IF97_T_25 + 5.0, &T);
  HlPhase phase = p > HL_IF97_P_CRITICAL ? HL_PHASE_SUPERCRITICAL : HL_PHASE_VAPOUR;
  if (status == HL_NOT_CONVERGED)
    return status;
  if (status == HL_OUTSIDE_RANGE && T <= T_low)
    return HL_OUTSIDE_RANGE;
  if (status == HL_OK && T <= HL_IF97_T_25 * (1.0 + T_SLACK))
    {
      if (T < T_low * (1.0 - T_SLACK))
        return HL_OUTSIDE_RANGE;
      hl_if97_region2 (p, T, state);
      finish (key, value, state);
      state->phase = phase;
      return HL_OK;
    }
  status = solve_region5 (key, p, value, state);
  if (status == HL_OK)
    state->phase = phase;
  return status;
}

/* Region 3 from its backward equations; an answer beyond the borders of the
 * region at this pressure means that the value lies in the jump there. */
static HlStatus
solve_region3 (Key key, double p, double value, double T_high, HlState *state)
{
  gboolean is_3a = key == KEY_H ? value <= hl_if97_B3ab_h (p) : value <= 4412.02148223476;
  HlState trial;
  HlStatus status;
  if (key == KEY_H)
    status = hl_if97_region3_ph (p, value, 1.0 / (is_3a ? hl_if97_v_ph_3a (p, value) : hl_if97_v_ph_3b (p, value)),
                                 is_3a ? hl_if97_T_ph_3a (p, value) : hl_if97_T_ph_3b (p, value), &trial);
  else
    status = hl_if97_region3_ps (p, value, 1.0 / (is_3a ? hl_if97_v_ps_3a (p, value) : hl_if97_v_ps_3b (p, value)),
                                 is_3a ? hl_if97_T_ps_3a (p, value) : hl_if97_T_ps_3b (p, value), &trial);
  if (status != HL_OK)
    return status;

  HlState below, above;
  if (trial.T < HL_IF97_T_13)
    {
      hl_if97_region1 (p, HL_IF97_T_13, &below);
      if ((status = hl_water_region3_pT (p, HL_IF97_T_13, TRUE, &above)) != HL_OK)
        return status;
      blend (key, value, &below, &above, state);
    }
  else if (trial.T > T_high)
    {
      if ((status = hl_water_region3_pT (p, T_high, FALSE, &below)) != HL_OK)
        return status;
      hl_if97_region2 (p, T_high, &above);
      blend (key, value, &below, &above, state);
    }
  else
    *state = trial;

  if (p < HL_IF97_P_CRITICAL)
    state->phase = is_3a ? HL_PHASE_LIQUID : HL_PHASE_VAPOUR;
  else
    state->phase = state->T > HL_IF97_T_CRITICAL ? HL_PHASE_SUPERCRITICAL : HL_PHASE_LIQUID;
  return HL_OK;
}

/* Between the ends of the line: the mixture whose key has the value. */
HL_IF97_INLINE void
solve_mixture (Key key, double value, const HlState *liquid, const HlState *vapour, HlState *state)
{
  double k_liquid = key_of (key, liquid), k_vapour = key_of (key, vapour), p_T;
  HlSaturation saturation;
  hl_if97_psat_T (liquid->T, &p_T);
  hl_water_saturation_from_ends (liquid, vapour, 1.0 / p_T, &saturation);
  hl_water_mix (&saturation, (value - k_liquid) / (k_vapour - k_liquid), state);
  if (key == KEY_H)
    state->h = value;
  else
    state->s = value;
}

/* Pressures where the saturation line lies between regions 1 and 2. */
HL_IF97_INLINE HlStatus
solve_low_pressure (Key key, double p, double value, HlState *state)
{
  HlState liquid, vapour;
  double T = hl_if97_Tsat (p);
  hl_if97_region1 (p, T, &liquid);
  if (value <= key_of (key, &liquid))
    return solve_region1 (key, p, value, state);
  hl_if97_region2 (p, T, &vapour);
  if (value >= key_of (key, &vapour))
    return solve_steam (key, p, value, T, state);
  solve_mixture (key, value, &liquid, &vapour, state);
  return HL_OK;
}

/* Pressures where region 3 lies between regions 1 and 2. */
HL_IF97_INLINE HlStatus
solve_high_pressure (Key key, double p, double value, HlState *state)
{
  HlState edge;
  hl_if97_region1 (p, HL_IF97_T_13, &edge);
  if (value <= key_of (key, &edge))
    return solve_region1 (key, p, value, state);
  double T_B23 = hl_if97_B23_T (p);
  hl_if97_region2 (p, T_B23, &edge);
  if (value >= key_of (key, &edge))
    return solve_steam (key, p, value, T_B23, state);
  if (p < HL_IF97_P_CRITICAL)
    {
      HlState liquid, vapour;
      HlStatus status = hl_water_saturated_ends (p, hl_if97_Tsat (p), &liquid, &vapour);
      if (status != HL_OK)
        return status;
      if (value > key_of (key, &liquid) && value < key_of (key, &vapour))
        {
          solve_mixture (key, value, &liquid, &vapour, state);
          return HL_OK;
        }
    }
  return solve_region3 (key, p, value, T_B23, state);
}

HL_IF97_INLINE HlStatus
solve (Key key, double p, double value, HlState *state)
{
  /* A trial beyond these bounds makes the polynomials overflow. */
  if (!(p > 0.0 && p <= HL_IF97_P_MAX) || !(key == KEY_H ? fabs (value) < 1e7 : fabs (value) < 1e5))
    return HL_OUTSIDE_RANGE;
  if (p > HL_IF97_P_SAT_13)
    return solve_high_pressure (key, p, value, state);
  if (p >= HL_IF97_P_MIN_SAT)
    return solve_low_pressure (key, p, value, state);
  return solve_steam (key, p, value, HL_IF97_T_MIN, state);
}

/**
 * hl_water_state_ph:
 * @fluid: water
 * @p: pressure [Pa]
 * @h: specific enthalpy [J/kg]
 * @state: (out): the state; untouched on failure
 *
 * The backward equation of the region gives a start, the region's own equation
 * the answer.
 *
 * Returns: HL_OK, HL_OUTSIDE_RANGE, or HL_NOT_CONVERGED
 */
HlStatus
hl_water_state_ph (const HlFluid *fluid G_GNUC_UNUSED, double p, double h, HlState *state)
{
  return solve (KEY_H, p, h, state);
}

/**
 * hl_water_state_ps:
 * @fluid: water
 * @p: pressure [Pa]
 * @s: specific entropy [J/(kg K)]
 * @state: (out): the state; untouched on failure
 *
 * As hl_water_state_ph().
 *
 * Returns: HL_OK, HL_OUTSIDE_RANGE, or HL_NOT_CONVERGED
 */
HlStatus
hl_water_state_ps (const HlFluid *fluid G_GNUC_UNUSED, double p, double s, HlState *state)
{
  return solve (KEY_S, p, s, state);
}
