/* Water and steam from enthalpy and entropy: the pressure at which s(p,h) has the value.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "fluid/water-private.h"

#include <math.h>

/* Entropies that the releases use as borders [J/(kg K)]: SR4-04, section 4. */
#define S_13_AT_P_MAX   3397.782955     /* 623.15 K, 100 MPa */
#define S_LIQUID_13     3778.281340     /* saturated liquid, 623.15 K */
#define S_CRITICAL      4412.02148223476
#define S_B23_LOW       5048.096828
#define S_LIQUID_MIXTURE 5210.887825    /* saturated vapour, 623.15 K: Tsat(h,s) holds from here */
#define S_B23_HIGH      5260.578707
#define S_2BC           5850.0
#define S_VAPOUR_MIN    9155.759395     /* saturated vapour, 273.15 K */

#define P_LOWEST   1e-6                 /* no state is looked for below [Pa] */
#define MOST_STEPS 100
#define P_SLACK    1e-9                 /* a pressure this near a limit counts as on it */

/* Saturated enthalpy at this entropy, roughly; above the line there is one phase. */
static double
saturated_enthalpy (double s)
{
  if (s < S_LIQUID_13)
    return hl_if97_h_liquid_1 (s);
  if (s < S_CRITICAL)
    return hl_if97_h_liquid_3a (s);
  return s < S_2BC ? hl_if97_h_vapour_2c3b (s) : s < S_VAPOUR_MIN ? hl_if97_h_vapour_2ab (s) : 0.0;
}

static double
start_single_phase (double h, double s)
{
  if (s <= S_LIQUID_13)
    {
      gboolean is_region1 = s <= S_13_AT_P_MAX || h < hl_if97_B13_h (s);
      /* The line's slope is so steep in liquid that any pressure will do; one
       * above the line saves the way through the mixture. */
      return is_region1 ? fmax (hl_if97_p_hs_1 (h, s), 1e5) : hl_if97_p_hs_3a (h, s);
    }
  if (s <= S_CRITICAL)
    return hl_if97_p_hs_3a (h, s);
  if (s < S_B23_LOW)
    return hl_if97_p_hs_3b (h, s);
  if (s < S_B23_HIGH && hl_if97_p_hs_2c (h, s) > hl_if97_B23_p (hl_if97_B23_T_hs (h, s)))
    return hl_if97_p_hs_3b (h, s);
  if (h > 4.2e6)
    {
      /* Region 5 as an ideal gas of constant heat capacity, from h and s at 1500 K and 0.5 MPa (Table 42). */
      double T = fmax (1500.0 + (h - 5.2198e6) / 2620.0, 1000.0);
      return 0.5e6 * exp ((9654.1 + 2620.0 * log (T / 1500.0) - s) / HL_IF97_R);
    }
  if (h <= hl_if97_B2ab_h (s) || s > 7900.0)
    return hl_if97_p_hs_2a (h, s);
  return s >= S_2BC ? hl_if97_p_hs_2b (h, s) : hl_if97_p_hs_2c (h, s);
}

/* Mixture: T from h - h'(T) = T (s - s'(T)) with liquid of constant heat
 * capacity, where the backward equation does not reach. */
static double
start_mixture (double h, double s)
{
  const double c = 4400.0;
  double T = 450.0;
  if (s >= S_LIQUID_MIXTURE)
    T = hl_if97_Tsat_hs (h, s);
  else
    for (int i = 0; i < 5; i++)
      {
        double s_liquid = c * log (T / HL_IF97_T_MIN);
        double step = (h - c * (T - HL_IF97_T_MIN) - T * (s - s_liquid)) / (s - s_liquid);
        T = fmin (fmax (T + step, HL_IF97_T_MIN), 0.5 * (T + HL_IF97_T_CRITICAL));
        if (!(s > c * log (T / HL_IF97_T_MIN)))
          break;
      }
  return hl_if97_psat (fmin (fmax (T, HL_IF97_T_MIN), HL_IF97_T_CRITICAL));
}

/* Along an isenthalp, liquid's entropy is about linear in p, a gas's or a
 * mixture's in ln p. */
static double
next_pressure (const HlState *state, double missing_s)
{
  double step = missing_s / state->s_p;
  if (state->phase == HL_PHASE_LIQUID)
    return state->p + step;
  return state->p * exp (fmin (fmax (step / state->p, -5.0), 5.0));
}

/* The bracket of the pressure, and the best state found in it. */
typedef struct {
  double   p, low, high;
  gboolean low_is_state, high_is_state;   /* has a state been computed at that end? */
  gboolean has_best;
  HlState  best;
  double   best_missing, best_step;       /* entropy missing [J/(kg K)], relative step of pressure left */
} Search;

static void
keep_best (Search *search, const HlState *trial, double missing, double step)
{
  if (search->has_best && missing >= search->best_missing)
    return;
  search->has_best = TRUE;
  search->best = *trial;
  search->best_missing = missing;
  search->best_step = step;
}

/* Takes the pressure just tried as an end of the bracket; FALSE where nothing
 * is left between the ends.  Where there was no state, it is too cold, too hot
 * or beyond region 5's pressure, which lower pressures mend, but for mixtures
 * below the lowest saturation pressure. */
static gboolean
narrow (Search *search, gboolean is_state, double missing, double h)
{
  gboolean rise = is_state ? missing < 0.0 : search->p < HL_IF97_P_MIN_SAT && h < 2.6e6;
  if (rise)
    {
      search->low = search->p;
      search->low_is_state = is_state;
    }
  else
    {
      search->high = search->p;
      search->high_is_state = is_state;
    }
  return search->high - search->low > 2e-15 * search->high && search->low < HL_IF97_P_MAX;
}

static double
choose_within (const Search *search, double next)
{
  if (next > search->low && next < search->high)
    return fmin (next, HL_IF97_P_MAX);
  double middle = search->high > 4.0 * search->low ? sqrt (search->low * search->high)
                                                   : 0.5 * (search->low + search->high);
  return fmin (middle, HL_IF97_P_MAX);
}

/* A bracket that closed between two states closed on a jump between regions,
 * where the boundary is the answer; one that closed against a limit has none. */
static HlStatus
conclude (const Search *search, double s, HlState *state)
{
  gboolean is_met = search->has_best && (search->best_step <= P_SLACK || search->best_missing <= 1e-13 * fabs (s));
  if (!is_met && !(search->has_best && search->low_is_state && search->high_is_state))
    return HL_OUTSIDE_RANGE;
  *state = search->best;
  if (is_met)
    state->s = s;
  return HL_OK;
}

/**
 * hl_water_state_hs:
 * @fluid: water
 * @h: specific enthalpy [J/kg]
 * @s: specific entropy [J/(kg K)]
 * @state: (out): the state; untouched on failure
 *
 * Entropy falls with pressure along an isenthalp everywhere (its slope is
 * -v/T), through all regions and the mixture: Newton's iteration in a bracket,
 * started from the backward equations.
 *
 * Returns: HL_OK, HL_OUTSIDE_RANGE, or HL_NOT_CONVERGED
 */
HlStatus
hl_water_state_hs (const HlFluid *fluid, double h, double s, HlState *state)
{
  if (!(fabs (h) < 1e7 && fabs (s) < 1e5))
    return HL_OUTSIDE_RANGE;
  double p = h >= saturated_enthalpy (s) ? start_single_phase (h, s) : start_mixture (h, s);
  Search search = { .low = P_LOWEST, .high = HL_IF97_P_MAX * (1.0 + P_SLACK) };
  search.p = p > P_LOWEST ? fmin (p, HL_IF97_P_MAX) : 1e5;
  for (int i = 0; i < MOST_STEPS; i++)
    {
      HlState trial;
      double missing = 0.0, next = 0.0;
      HlStatus status = hl_water_state_ph (fluid, search.p, h, &trial);
      if (status == HL_NOT_CONVERGED)
        return status;
      if (status == HL_OK)
        {
          missing = s - trial.s;
          next = next_pressure (&trial, missing);
          keep_best (&search, &trial, fabs (missing), fabs (next - search.p) / search.p);
          if (search.best_step <= 1e-12 || search.best_missing <= 2e-16 * fabs (s))
            break;
        }
      if (!narrow (&search, status == HL_OK, missing, h))
        break;
      search.p = choose_within (&search, next);
    }
  return conclude (&search, s, state);
}
