/* States of a Helmholtz fluid by (p,h) and (p,s).
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "fluid/helmholtz-private.h"

#include <math.h>

#define FAST_STEPS 14
#define STEP_DONE 2e-9          /* relative in T and v; the rest is corrected to first order and leaves its square */
#define SAFE_STEPS 120
#define CLOSE_TO_DOME 3e-4      /* of R Tc or R: within this of the line's table the line is solved exactly */
#define ZETA_CRITICAL 1e-3      /* sqrt(1 - T/Tc) */
#define START_TABLE_FROM 0.7    /* of the critical pressure: starts come from the table of isobars above it */

/* What is sought and where it may lie. */
typedef struct {
  const HlHelmholtz *eq;
  double   p, value;
  HlHeld   held;
  HlBranch branch;
  double   T_low, T_high;       /* the branch on this isobar */
} Search;

static double
held_of (HlHeld held, const HlState *state)
{
  return held == HL_HELD_H ? state->h : state->s;
}

/* Enthalpy that is missing at a state whose pressure is off by miss_p: for given s from dh = T ds + v dp. */
static double
missing_h (const Search *search, const HlState *state, double miss_p)
{
  if (search->held == HL_HELD_H)
    return search->value - state->h;
  return state->T * (search->value - state->s) + state->v * miss_p;
}

static void
finish (const Search *search, double dT, double dv, double dh, double dp, HlState *state)
{
  state->s += (dh - state->v * dp) / state->T;
  state->h += dh;
  state->T += dT;
  state->v += dv;
  state->p = search->p;
  if (search->held == HL_HELD_H)
    state->h = search->value;
  else
    state->s = search->value;
  state->u = state->h - state->p * state->v;
}

static gboolean
is_on_branch (const Search *search, const HlState *state)
{
  /* dp/dd above 0, but for rounding at the critical point, and a real speed of sound. */
  if (!(state->T_h * search->eq->R > -1e-9) || !(state->cv > 0.0) || !(state->w > 0.0))
    return FALSE;
  switch (search->branch)
    {
    case HL_BRANCH_LIQUID: return state->v * search->eq->dc < 1.0;
    case HL_BRANCH_VAPOUR: return state->v * search->eq->dc > 1.0 || state->T > search->eq->Tc;
    case HL_BRANCH_ABOVE: break;
    }
  return TRUE;
}

/* Newton's method in T and v together.  It gives up early rather than wander:
 * the safe way below then decides. */
static gboolean
solve_fast (const Search *search, double T, double v, HlState *state)
{
  const HlHelmholtz *eq = search->eq;
  double T_least = 0.97 * search->T_low, T_most = 1.03 * search->T_high;
  for (int i = 0; i < FAST_STEPS; i++)
    {
      HlState here;
      hl_helmholtz_state (eq, 1.0 / v, T, &here);
      double dp = search->p - here.p, dh = missing_h (search, &here, dp);
      double dT = here.T_p * dp + here.T_h * dh, dv = here.v_p * dp + here.v_h * dh;
      if (!isfinite (dT) || !isfinite (dv))
        return FALSE;
      if (fabs (dT) <= STEP_DONE * T && fabs (dv) <= STEP_DONE * v)
        {
          finish (search, dT, dv, dh, dp, &here);
          if (!is_on_branch (search, &here) || !(here.T >= search->T_low && here.T <= search->T_high))
            return FALSE;
          *state = here;
          return TRUE;
        }
      T = CLAMP (T + dT, T_least, T_most);
      v = CLAMP (v + dv, 0.5 * v, 2.0 * v);
    }
  return FALSE;
}

static HlStatus
state_at_T (const Search *search, double T, HlState *state)
{
  double density;
  HlBranch branch = T >= search->eq->Tc ? HL_BRANCH_ABOVE : search->branch == HL_BRANCH_ABOVE ? HL_BRANCH_LIQUID : search->branch;
  HlStatus status = hl_helmholtz_density (search->eq, search->p, T, branch, &density);
  if (status == HL_OK)
    hl_helmholtz_state (search->eq, density, T, state);
  return status;
}

/* Temperature alone between bounds, the density of each solved on its branch:
 * h and s rise with T along an isobar, so the root is the only one. */
static HlStatus
solve_safe (const Search *search, HlState *state, HlSide *side)
{
  HlState cold, hot, here = { 0 };
  HlStatus status;
  if ((status = state_at_T (search, search->T_low, &cold)) != HL_OK || (status = state_at_T (search, search->T_high, &hot)) != HL_OK)
    return status;
  double below = search->value - held_of (search->held, &cold), above = held_of (search->held, &hot) - search->value;
  double rounding = 1e-13 * fmax (fabs (search->value), held_of (search->held, &hot) - held_of (search->held, &cold));
  if (below < -rounding || above < -rounding)
    {
      *side = above < -rounding ? HL_SIDE_HOT : HL_SIDE_COLD;
      return HL_OUTSIDE_RANGE;
    }
  double low = search->T_low, high = search->T_high;
  double T = below < above ? low : high;
  for (int i = 0; i < SAFE_STEPS; i++)
    {
      if ((status = state_at_T (search, T, &here)) != HL_OK)
        return status;
      double miss = search->value - held_of (search->held, &here);
      if (miss > 0.0)
        low = T;
      else
        high = T;
      double dT = miss * (search->held == HL_HELD_H ? here.T_h : here.T_h * here.T);
      if (fabs (dT) <= 1e-10 * T || high - low <= 4e-16 * high)
        {
          double dp = search->p - here.p, dh = missing_h (search, &here, dp);
          finish (search, dT, here.v_p * dp + here.v_h * dh, dh, dp, &here);
          here.T = CLAMP (here.T, search->T_low, search->T_high);
          *state = here;
          return HL_OK;
        }
      T = T + dT > low && T + dT < high ? T + dT : 0.5 * (low + high);
    }
  return HL_NOT_CONVERGED;
}

static double
across_levels (const double (*columns)[HL_START_STEPS + 1], guint level, guint step, const double w[4])
{
  return w[0] * columns[level][step] + w[1] * columns[level + 1][step] + w[2] * columns[level + 2][step] + w[3] * columns[level + 3][step];
}

/* From the table of isobars, cubic in both directions; FALSE below its first one. */
static gboolean
start_from_isobars (const Search *search, double *T, double *v)
{
  const HlStartTable *table = &search->eq->start;
  const double (*columns)[HL_START_STEPS + 1] = search->held == HL_HELD_H ? table->h : table->s;
  double ln_p = fmax (log (search->p), table->ln_p[0]), levels[4], w[4], x[4];
  guint level = 0, low = 0, high = HL_START_STEPS;
  if (table->n_levels < 4 || search->p < START_TABLE_FROM * search->eq->pc)
    return FALSE;
  while (level + 4 < table->n_levels && ln_p > table->ln_p[level + 2])
    level++;
  hl_lagrange_weights (table->ln_p + level, ln_p, levels);
  while (high - low > 1)
    {
      guint middle = (low + high) / 2;
      *(across_levels (columns, level, middle, levels) <= search->value ? &low : &high) = middle;
    }
  guint first = low == 0 ? 0 : MIN (low - 1, HL_START_STEPS - 3);
  for (guint i = 0; i < 4; i++)
    x[i] = across_levels (columns, level, first + i, levels);
  hl_lagrange_weights (x, search->value, w);
  *T = *v = 0.0;
  for (guint i = 0; i < 4; i++)
    {
      *T += w[i] * across_levels (table->T, level, first + i, levels);
      *v += w[i] * across_levels (table->v, level, first + i, levels);
    }
  /* Beyond the ends of an isobar a cubic runs away. */
  return *T > 0.9 * search->T_low && *T < 1.1 * search->T_high && *v > 0.0;
}

static HlStatus
solve_phase (const Search *search, double T_start, double v_start, HlState *state, HlSide *side)
{
  double T, v;
  HlStatus status = HL_OK;
  if (!start_from_isobars (search, &T, &v))
    {
      T = T_start;
      v = v_start;
    }
  if (!solve_fast (search, T, v, state))
    status = solve_safe (search, state, side);
  if (status == HL_OK)
    {
      state->x = NAN;
      state->phase = hl_helmholtz_phase (search->eq, search->p, state->T, search->branch == HL_BRANCH_LIQUID);
    }
  return status;
}

/* One phase above the critical pressure, where nothing divides the isobar, or
 * vapour below the lowest saturation pressure. */
static HlStatus
whole_isobar (Search *search, HlState *state, HlSide *side)
{
  const HlHelmholtz *eq = search->eq;
  search->T_low = eq->T_min;
  search->T_high = eq->T_max;
  search->branch = search->p < eq->pc ? HL_BRANCH_VAPOUR : HL_BRANCH_ABOVE;
  return solve_phase (search, eq->T_min, eq->R * eq->T_min / search->p, state, side);
}

/* The line is known to the table's error only; h or s decide by a wide margin. */
static HlStatus
beside_dome (Search *search, double zeta, gboolean is_liquid, HlState *state, HlSide *side)
{
  const HlHelmholtz *eq = search->eq;
  double T_sat = hl_helmholtz_T_of_zeta (eq, zeta), T, v;
  search->branch = is_liquid ? HL_BRANCH_LIQUID : HL_BRANCH_VAPOUR;
  search->T_low = is_liquid ? eq->T_min : T_sat;
  search->T_high = is_liquid ? T_sat : eq->T_max;
  if (hl_helmholtz_grid_start (eq, search->p, zeta, search->held, search->value, is_liquid, &T, &v) && solve_fast (search, T, v, state))
    {
      state->phase = is_liquid ? HL_PHASE_LIQUID : HL_PHASE_VAPOUR;
      return HL_OK;
    }
  return solve_phase (search, T_sat, exp (-hl_helmholtz_table (eq, is_liquid ? HL_SAT_LN_D_LIQUID : HL_SAT_LN_D_VAPOUR, zeta)), state, side);
}

/* Close to the line or inside: its exact ends decide. */
static HlStatus
at_dome (Search *search, double zeta, HlState *state, HlSide *side)
{
  const HlHelmholtz *eq = search->eq;
  HlSaturation sat;
  HlStatus status = hl_helmholtz_saturation_at (eq, search->p, zeta, &sat);
  if (status != HL_OK)
    return status;
  double liquid = search->held == HL_HELD_H ? sat.h_liquid : sat.s_liquid;
  double vapour = search->held == HL_HELD_H ? sat.h_vapour : sat.s_vapour;
  if (search->value >= liquid && search->value <= vapour && vapour > liquid)
    {
      hl_helmholtz_mix (&sat, (search->value - liquid) / (vapour - liquid), state);
      if (search->held == HL_HELD_H)
        state->h = search->value;
      else
        state->s = search->value;
      return HL_OK;
    }
  gboolean is_liquid = search->value < liquid;
  search->branch = is_liquid ? HL_BRANCH_LIQUID : HL_BRANCH_VAPOUR;
  search->T_low = is_liquid ? eq->T_min : sat.T;
  search->T_high = is_liquid ? sat.T : eq->T_max;
  /* As good as at the critical point: the temperature hardly tells the sides apart, v and T together still do. */
  if (hl_helmholtz_zeta_of_T (eq, sat.T) < ZETA_CRITICAL)
    {
      search->branch = HL_BRANCH_ABOVE;
      search->T_low = eq->T_min;
      search->T_high = eq->T_max;
    }
  if (solve_fast (search, sat.T, is_liquid ? sat.v_liquid : sat.v_vapour, state))
    {
      state->phase = is_liquid ? HL_PHASE_LIQUID : HL_PHASE_VAPOUR;
      return HL_OK;
    }
  return solve_phase (search, sat.T, is_liquid ? sat.v_liquid : sat.v_vapour, state, side);
}

/**
 * hl_helmholtz_from_p:
 * @eq: an equation
 * @p: pressure [Pa]
 * @held: what is given beside it
 * @value: its value, SI
 * @state: (out): the state; untouched on failure
 * @side: (out): where outside the range the pair lies; set on that failure only
 *
 * Returns: HL_OK, HL_OUTSIDE_RANGE, or HL_NOT_CONVERGED
 */
HlStatus
hl_helmholtz_from_p (const HlHelmholtz *eq, double p, HlHeld held, double value, HlState *state, HlSide *side)
{
  Search search = { .eq = eq, .p = p, .value = value, .held = held };
  HlState found;
  HlStatus status;
  *side = HL_SIDE_PRESSURE;
  if (!(p > 0.0 && p <= eq->p_max && isfinite (value)))
    return HL_OUTSIDE_RANGE;
  *side = HL_SIDE_NONE;
  if (p < eq->p_min_sat || p > eq->pc)
    status = whole_isobar (&search, &found, side);
  else
    {
      double zeta = hl_helmholtz_zeta_of_p (eq, p);
      double liquid = hl_helmholtz_table (eq, held == HL_HELD_H ? HL_SAT_H_LIQUID : HL_SAT_S_LIQUID, zeta);
      double vapour = hl_helmholtz_table (eq, held == HL_HELD_H ? HL_SAT_H_VAPOUR : HL_SAT_S_VAPOUR, zeta);
      double margin = CLOSE_TO_DOME * eq->R * (held == HL_HELD_H ? eq->Tc : 1.0);
      if (value < liquid - margin || value > vapour + margin)
        status = beside_dome (&search, zeta, value < liquid, &found, side);
      else
        status = at_dome (&search, zeta, &found, side);
    }
  if (status == HL_OK)
    *state = found;
  return status;
}

HlStatus
hl_helmholtz_state_ph (const HlFluid *fluid, double p, double h, HlState *state)
{
  HlSide side;
  return hl_helmholtz_from_p (hl_helmholtz_of (fluid), p, HL_HELD_H, h, state, &side);
}

HlStatus
hl_helmholtz_state_ps (const HlFluid *fluid, double p, double s, HlState *state)
{
  HlSide side;
  return hl_helmholtz_from_p (hl_helmholtz_of (fluid), p, HL_HELD_S, s, state, &side);
}

/* Fills one isobar, each state starting from the one before; FALSE where one is not found. */
static gboolean
fill_level (HlHelmholtz *eq, guint level, double p)
{
  Search search = { .eq = eq, .p = p, .held = HL_HELD_H, .branch = HL_BRANCH_ABOVE, .T_low = eq->T_min, .T_high = eq->T_max };
  HlState cold, hot, here;
  HlSide side;
  if (state_at_T (&search, eq->T_min, &cold) != HL_OK || state_at_T (&search, eq->T_max, &hot) != HL_OK)
    return FALSE;
  here = cold;
  for (guint i = 0; i <= HL_START_STEPS; i++)
    {
      search.value = cold.h + (hot.h - cold.h) * i / HL_START_STEPS;
      double dh = search.value - here.h, v = fmax (here.v + here.v_h * dh, 0.5 * here.v);
      if (i == HL_START_STEPS)
        here = hot;
      else if (i > 0 && !solve_fast (&search, here.T + here.T_h * dh, v, &here) && solve_safe (&search, &here, &side) != HL_OK)
        return FALSE;
      eq->start.h[level][i] = here.h;
      eq->start.s[level][i] = here.s;
      eq->start.T[level][i] = here.T;
      eq->start.v[level][i] = here.v;
    }
  return TRUE;
}

/* Isobars at these multiples of the critical pressure, the last at the highest allowed one. */
void
hl_helmholtz_build_starts (HlHelmholtz *eq)
{
  static const double multiples[] = { 1.0, 1.12, 1.3, 1.6, 2.0, 2.8, 4.0, 7.0, 13.0, 30.0, 80.0, 250.0 };
  guint n = 0;
  for (guint i = 0; i < HL_START_LEVELS && (n == 0 || exp (eq->start.ln_p[n - 1]) < 0.999 * eq->p_max); i++)
    {
      double p = i + 1 == HL_START_LEVELS ? eq->p_max : fmin (multiples[i] * eq->pc, eq->p_max);
      if (!fill_level (eq, n, p))
        break;
      eq->start.ln_p[n++] = log (p);
    }
  eq->start.n_levels = n;
}
