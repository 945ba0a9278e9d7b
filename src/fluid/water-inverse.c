/* Water and steam from pressure and enthalpy or entropy: region, starting value, polish.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "fluid/water-edges.h"
#include "fluid/water-private.h"

#include <math.h>

/* Every function that takes a key is inlined with a constant, so that (p,h)
 * and (p,s) are two programs from one text. */
typedef double (*Caloric) (double p, double T, double *cp);
typedef double (*AtValue) (double p, double T, double value, double most_left, HlState *state);

#define MOST_STEPS 40

/* Newton's steps smaller than this leave a start from which the last evaluation is exact [K]. */
#define NEAR 0.03

/* Relative error of cp and the other derivatives that is not worth a second
 * evaluation; T, h, s and v are then good to some 1e-13. */
#define LEAVE 1e-9

/* Starts nearer to a region's limits than this ask for care, as the root may
 * lie beyond; with LEAVE above no last step is as long [K]. */
#define CARE 0.1

/* A temperature this near a limit counts as on it: the rounding of h and s
 * must not put a state outside that (p,T) has put on the limit. */
#define T_SLACK 1e-9

HL_IF97_INLINE double
key_of (HlKey key, const HlState *state)
{
  return key == HL_KEY_H ? state->h : state->s;
}

/* T at given p where the key has the value, from far off to what the last small step leaves. */
HL_IF97_INLINE HlStatus
approach_T (Caloric region, HlKey key, double p, double value, double T_low, double T_high, double *T)
{
  for (int i = 0; i < MOST_STEPS; i++)
    {
      double cp, k = region (p, *T, &cp);
      double step = key == HL_KEY_H ? (value - k) / cp : (value - k) * *T / cp;
      double next = *T + step;
      if (fabs (step) < NEAR)
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

/* The state at given p where the key has the value, iterated from any start. */
HL_IF97_INLINE HlStatus
solve_with_care (AtValue at_value, Caloric region, HlKey key, double p, double value, double T_low, double T_high, double *T,
                 HlState *trial)
{
  HlStatus status = approach_T (region, key, p, value, T_low, T_high, T);
  if (status != HL_OK)
    return status;
  at_value (p, *T, value, INFINITY, trial);
  *T = trial->T;
  return HL_OK;
}

/* Where two regions meet with a small jump, no state has the value: the
 * answer is the boundary's temperature, and between the two sides' properties
 * in the proportion in which the value lies between theirs. */
static void
blend (HlKey key, double value, const HlState *below, const HlState *above, HlState *state)
{
  double k_below = key == HL_KEY_H ? below->h : below->s, k_above = key == HL_KEY_H ? above->h : above->s;
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
  if (key == HL_KEY_H)
    state->h = value;
  else
    state->s = value;
}

/* The backward equation T(p,s) of region 1 is near enough for one evaluation,
 * T(p,h) mostly not: Newton's step with h and cp alone is the cheaper way. */
HL_IF97_INLINE HlStatus
solve_region1 (HlKey key, double p, double value, HlState *state)
{
  AtValue at_value = key == HL_KEY_H ? hl_if97_region1_at_h : hl_if97_region1_at_s;
  Caloric region = key == HL_KEY_H ? hl_if97_region1_enthalpy : hl_if97_region1_entropy;
  double T = key == HL_KEY_H ? hl_if97_T_ph_1 (p, value) : hl_if97_T_ps_1 (p, value);
  if (T > HL_IF97_T_MIN + CARE)
    {
      if (key == HL_KEY_H)
        {
          double cp, h = region (p, T, &cp);
          T += (value - h) / cp;
        }
      if (at_value (p, T, value, LEAVE, state) <= LEAVE)
        {
          state->phase = HL_PHASE_LIQUID;
          return HL_OK;
        }
    }

  HlState trial;
  T = fmin (fmax (T, HL_IF97_T_MIN), HL_IF97_T_13);
  HlStatus status = solve_with_care (at_value, region, key, p, value, HL_IF97_T_MIN - 5.0, HL_IF97_T_13 + 5.0, &T, &trial);
  if (status != HL_OK)
    return status;
  if (T < HL_IF97_T_MIN * (1.0 - T_SLACK))
    return HL_OUTSIDE_RANGE;
  *state = trial;
  state->phase = HL_PHASE_LIQUID;
  return HL_OK;
}

HL_IF97_INLINE double
start_region2 (HlKey key, double p, double value)
{
  /* The backward equations hold from psat(273.15 K) up; below, steam is an
   * ideal gas: h depends on T alone, s on ln p besides. */
  if (p < HL_IF97_P_MIN_SAT)
    {
      if (key == HL_KEY_S)
        value += HL_IF97_R * log (p / HL_IF97_P_MIN_SAT);
      p = HL_IF97_P_MIN_SAT;
    }
  if (p <= 4e6)
    return key == HL_KEY_H ? hl_if97_T_ph_2a (p, value) : hl_if97_T_ps_2a (p, value);
  if (key == HL_KEY_H ? p < 6.546699678e6 || value >= hl_if97_B2bc_h (p) : value >= 5850.0)
    return key == HL_KEY_H ? hl_if97_T_ph_2b (p, value) : hl_if97_T_ps_2b (p, value);
  /* The equations of 2c are off by up to 24 mK, where cp changes fast: Newton's step. */
  double T = key == HL_KEY_H ? hl_if97_T_ph_2c (p, value) : hl_if97_T_ps_2c (p, value), cp;
  double k = (key == HL_KEY_H ? hl_if97_region2_enthalpy : hl_if97_region2_entropy) (p, T, &cp);
  return T + (key == HL_KEY_H ? (value - k) / cp : (value - k) * T / cp);
}

/* Region 5 as an ideal gas of constant heat capacity, from its state at
 * 1500 K and 0.5 MPa (R7-97, Table 42): right to some 50 K. */
#define T_5  1500.0
#define H_5  5.2198e6
#define S_5  9654.1
#define P_5  0.5e6
#define CP_5 2620.0

/* The backward equations of region 2 must not be asked far above it.  Where
 * the ideal gas is hotter than 1120 K, the state lies in region 5 at any pressure. */
HL_IF97_INLINE gboolean
is_clearly_region5 (HlKey key, double p, double value)
{
  if (key == HL_KEY_H)
    return value > H_5 + (1120.0 - T_5) * CP_5;
  return value + HL_IF97_R * log (p / P_5) > S_5 - 0.29213 * CP_5;   /* ln (1500/1120) */
}

/* Region 5, or the boundary with region 2 at 1073.15 K. */
static HlStatus
solve_region5 (HlKey key, double p, double value, HlState *state)
{
  if (p > HL_IF97_P_MAX_5)
    return HL_OUTSIDE_RANGE;
  double T = key == HL_KEY_H ? T_5 + (value - H_5) / CP_5
                             : T_5 * exp (fmin ((value - S_5 + HL_IF97_R * log (p / P_5)) / CP_5, 1.0));
  T = fmin (fmax (T, HL_IF97_T_25), HL_IF97_T_MAX);
  HlState trial;
  HlStatus status = key == HL_KEY_H
    ? solve_with_care (hl_if97_region5_at_h, hl_if97_region5_enthalpy, HL_KEY_H, p, value, HL_IF97_T_25 - 50.0,
                       HL_IF97_T_MAX + 50.0, &T, &trial)
    : solve_with_care (hl_if97_region5_at_s, hl_if97_region5_entropy, HL_KEY_S, p, value, HL_IF97_T_25 - 50.0,
                       HL_IF97_T_MAX + 50.0, &T, &trial);
  if (status != HL_OK)
    return status;
  if (T > HL_IF97_T_MAX * (1.0 + T_SLACK))
    return HL_OUTSIDE_RANGE;
  if (T > HL_IF97_T_25)
    {
      *state = trial;
      return HL_OK;
    }
  HlState below, above;
  hl_if97_region2 (p, HL_IF97_T_25, &below);
  hl_if97_region5 (p, HL_IF97_T_25, &above);
  blend (key, value, &below, &above, state);
  return HL_OK;
}

/* Steam near the limits of region 2, or above in region 5. */
static HlStatus
solve_steam_with_care (HlKey key, double p, double value, double T_low, double T, HlState *state)
{
  HlState trial;
  HlStatus status = HL_OUTSIDE_RANGE;
  T = fmin (fmax (T, T_low), HL_IF97_T_25);
  if (!is_clearly_region5 (key, p, value))
    status = key == HL_KEY_H
      ? solve_with_care (hl_if97_region2_at_h, hl_if97_region2_enthalpy, HL_KEY_H, p, value, T_low - 5.0,
                         HL_IF97_T_25 + 5.0, &T, &trial)
      : solve_with_care (hl_if97_region2_at_s, hl_if97_region2_entropy, HL_KEY_S, p, value, T_low - 5.0,
                         HL_IF97_T_25 + 5.0, &T, &trial);
  else
    T = HL_IF97_T_25;
  if (status == HL_OK && T <= HL_IF97_T_25 * (1.0 + T_SLACK))
    {
      if (T < T_low * (1.0 - T_SLACK))
        return HL_OUTSIDE_RANGE;
      *state = trial;
    }
  else if (status == HL_NOT_CONVERGED || T <= T_low)
    return status;
  else if ((status = solve_region5 (key, p, value, state)) != HL_OK)
    return status;
  state->phase = p > HL_IF97_P_CRITICAL ? HL_PHASE_SUPERCRITICAL : HL_PHASE_VAPOUR;
  return HL_OK;
}

/* Steam of region 2 or 5; T_low is the lowest temperature of steam at this
 * pressure, or any below it where the value is known to be steam's. */
HL_IF97_INLINE HlStatus
solve_steam (HlKey key, double p, double value, double T_low, HlState *state)
{
  double T = start_region2 (key, p, value);
  if (T > T_low + CARE && T < HL_IF97_T_25 - CARE
      && (key == HL_KEY_H ? hl_if97_region2_at_h : hl_if97_region2_at_s) (p, T, value, LEAVE, state) <= LEAVE)
    {
      state->phase = p > HL_IF97_P_CRITICAL ? HL_PHASE_SUPERCRITICAL : HL_PHASE_VAPOUR;
      return HL_OK;
    }
  return solve_steam_with_care (key, p, value, T_low, T, state);
}

/* Region 3 from its backward equations; an answer beyond the borders of the
 * region at this pressure means that the value lies in the jump there. */
static HlStatus
solve_region3 (HlKey key, double p, double value, double T_high, HlState *state)
{
  gboolean is_3a = key == HL_KEY_H ? value <= hl_if97_B3ab_h (p) : value <= 4412.02148223476;
  HlState trial;
  HlStatus status;
  if (key == HL_KEY_H)
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
solve_mixture (HlKey key, double value, const HlState *liquid, const HlState *vapour, HlState *state)
{
  double k_liquid = key_of (key, liquid), k_vapour = key_of (key, vapour), p_T;
  HlSaturation saturation;
  hl_if97_psat_T (liquid->T, &p_T);
  hl_water_saturation_from_ends (liquid, vapour, 1.0 / p_T, &saturation);
  hl_water_mix (&saturation, (value - k_liquid) / (k_vapour - k_liquid), state);
  if (key == HL_KEY_H)
    state->h = value;
  else
    state->s = value;
}

/* Near the line or between its ends: the ends themselves decide. */
static HlStatus
solve_low_pressure_at_ends (HlKey key, double p, double value, HlState *state)
{
  HlState liquid, vapour;
  double T = hl_if97_Tsat (p);
  hl_if97_region1 (p, T, &liquid);
  if (value <= key_of (key, &liquid))
    return key == HL_KEY_H ? solve_region1 (HL_KEY_H, p, value, state) : solve_region1 (HL_KEY_S, p, value, state);
  hl_if97_region2 (p, T, &vapour);
  if (value >= key_of (key, &vapour))
    return key == HL_KEY_H ? solve_steam (HL_KEY_H, p, value, T, state) : solve_steam (HL_KEY_S, p, value, T, state);
  solve_mixture (key, value, &liquid, &vapour, state);
  return HL_OK;
}

/* Pressures where the saturation line lies between regions 1 and 2. */
HL_IF97_INLINE HlStatus
solve_low_pressure (HlKey key, double p, double value, HlState *state)
{
  double z = hl_edge_variable (HL_EDGE_LIQUID, p);
  if (value < hl_edge_value (HL_EDGE_LIQUID, key, z) - hl_edges[HL_EDGE_LIQUID][key].margin)
    return solve_region1 (key, p, value, state);
  if (value > hl_edge_value (HL_EDGE_VAPOUR, key, z) + hl_edges[HL_EDGE_VAPOUR][key].margin)
    return solve_steam (key, p, value, HL_IF97_T_MIN, state);
  return solve_low_pressure_at_ends (key, p, value, state);
}

/* Is a value of region 3 at this subcritical pressure clearly outside the
 * mixture?  SR3-03's line holds to 0.01 % (0.1 % near its ends). */
HL_IF97_INLINE gboolean
is_clear_of_mixture (HlKey key, double p, double value)
{
  if (key == HL_KEY_H)
    return value > 1.671e6 && value < 2.563e6 && p > 1.005 * hl_if97_psat3_h (value);
  return value > 3779.0 && value < 5210.0 && p > 1.005 * hl_if97_psat3_s (value);
}

/* Between the edges of regions 1 and 2: region 3 or its mixture. */
static HlStatus
solve_middle (HlKey key, double p, double value, double T_B23, HlState *state)
{
  if (p < HL_IF97_P_CRITICAL && !is_clear_of_mixture (key, p, value))
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

/* Pressures where region 3 lies between regions 1 and 2; the edges are
 * evaluated where their approximation does not decide. */
HL_IF97_INLINE HlStatus
solve_high_pressure (HlKey key, double p, double value, HlState *state)
{
  double z = hl_edge_variable (HL_EDGE_13, p), cp;
  double past_13 = value - hl_edge_value (HL_EDGE_13, key, z);
  if (fabs (past_13) <= hl_edges[HL_EDGE_13][key].margin)
    past_13 = value - (key == HL_KEY_H ? hl_if97_region1_enthalpy : hl_if97_region1_entropy) (p, HL_IF97_T_13, &cp);
  if (past_13 <= 0.0)
    return solve_region1 (key, p, value, state);
  double past_B23 = value - hl_edge_value (HL_EDGE_B23, key, z), T_B23 = hl_if97_B23_T (p);
  if (fabs (past_B23) <= hl_edges[HL_EDGE_B23][key].margin)
    past_B23 = value - (key == HL_KEY_H ? hl_if97_region2_enthalpy : hl_if97_region2_entropy) (p, T_B23, &cp);
  if (past_B23 >= 0.0)
    return solve_steam (key, p, value, T_B23, state);
  return solve_middle (key, p, value, T_B23, state);
}

HL_IF97_INLINE HlStatus
solve (HlKey key, double p, double value, HlState *state)
{
  /* A trial beyond these bounds makes the polynomials overflow. */
  if (!(p > 0.0 && p <= HL_IF97_P_MAX) || !(key == HL_KEY_H ? fabs (value) < 1e7 : fabs (value) < 1e5))
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
  return solve (HL_KEY_H, p, h, state);
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
  return solve (HL_KEY_S, p, s, state);
}
