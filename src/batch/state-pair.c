/* States from pairs: straight where the fluid answers the pair, else by a search that finds every answer.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "batch/state-pair.h"

#include <math.h>
#include "plant/i18n.h"

/* The search walks from @low to @high in equal steps, so that no answer hides behind another one, and closes in on each
 * change of sign and on each turn. */
#define N_STEPS 200

typedef HlStatus (*StateCall) (const HlFluid *fluid, double a, double b, HlState *state);

static const char *const key_signs[HL_N_STATE_KEYS] = { "p", "T", "h", "s", "rho", "x" };

typedef struct {
  HlStateKey first, second;
  StateCall  call;
  const char *pair;        /* word of hl_fluid_explain_failure(); NULL where a search would say no more */
} StraightPair;

static const StraightPair straight_pairs[] = {
  { HL_STATE_P, HL_STATE_T, hl_fluid_state_pT, "pT" },
  { HL_STATE_P, HL_STATE_H, hl_fluid_state_ph, "ph" },
  { HL_STATE_P, HL_STATE_S, hl_fluid_state_ps, "ps" },
  { HL_STATE_H, HL_STATE_S, hl_fluid_state_hs, "hs" },
  { HL_STATE_P, HL_STATE_X, hl_fluid_state_px, "px" },
  { HL_STATE_T, HL_STATE_X, hl_fluid_state_Tx, "Tx" },
  { HL_STATE_RHO, HL_STATE_T, hl_fluid_state_dT, NULL },
};

/* One quantity is held, another is sought by moving along the third. */
typedef struct {
  const HlFluid *fluid;
  HlStateKey     held, sought;
  double         held_value, sought_value;
} Search;

static double
state_quantity (const HlState *state, HlStateKey key)
{
  switch (key)
    {
    case HL_STATE_P: return state->p;
    case HL_STATE_T: return state->T;
    case HL_STATE_H: return state->h;
    case HL_STATE_S: return state->s;
    case HL_STATE_RHO: return 1.0 / state->v;
    case HL_STATE_X: return state->x;
    default: g_return_val_if_reached (NAN);
    }
}

/* Where the search stands: T held, ln p moves; p held, h moves; x held, T moves. */
static HlStatus
state_along (const Search *search, double place, HlState *state)
{
  switch (search->held)
    {
    case HL_STATE_T: return hl_fluid_state_pT (search->fluid, exp (place), search->held_value, state);
    case HL_STATE_P: return hl_fluid_state_ph (search->fluid, search->held_value, place, state);
    case HL_STATE_X: return hl_fluid_state_Tx (search->fluid, place, search->held_value, state);
    default: g_return_val_if_reached (HL_OUTSIDE_RANGE);
    }
}

static gboolean
miss_along (const Search *search, double place, double *miss, HlState *state)
{
  if (state_along (search, place, state) != HL_OK)
    return FALSE;
  *miss = state_quantity (state, search->sought) - search->sought_value;
  return isfinite (*miss);
}

/* Between two places whose misses differ in sign: secant steps kept inside the bracket, halving when they are slow. */
static gboolean
close_in (const Search *search, double low, double low_miss, double high, double high_miss, HlState *state)
{
  for (int step = 0; step < 200; step++)
    {
      double place = low + (high - low) * low_miss / (low_miss - high_miss), miss;
      double margin = 1e-3 * (high - low);
      if (step % 3 == 2 || !(place > low + margin && place < high - margin))
        place = 0.5 * (low + high);
      if (!miss_along (search, place, &miss, state))
        return FALSE;
      if (miss == 0.0 || fabs (high - low) <= 4e-16 * MAX (fabs (low), fabs (high)))
        return TRUE;
      if ((miss > 0.0) == (low_miss > 0.0))
        {
          low = place;
          low_miss = miss;
        }
      else
        {
          high = place;
          high_miss = miss;
        }
    }
  return TRUE;
}

typedef struct { double place, miss; } Sample;

static void
append_between (const Search *search, const Sample *a, const Sample *b, GArray *states)
{
  HlState state;
  if (close_in (search, a->place, a->miss, b->place, b->miss, &state))
    g_array_append_val (states, state);
}

/* Three misses of one sign, the middle one nearest to naught: the curve turns there (water is densest near 4 °C), and
 * may cross twice between two steps.  Golden section towards the turn, until it crosses or is found not to. */
static void
look_at_turn (const Search *search, const Sample *first, const Sample *last, GArray *states)
{
  const double golden = 0.38196601125010515;
  double low = first->place, high = last->place, sign = first->miss > 0.0 ? 1.0 : -1.0;
  Sample inner[2] = { { low + golden * (high - low), 0.0 }, { high - golden * (high - low), 0.0 } };
  HlState state;
  if (!miss_along (search, inner[0].place, &inner[0].miss, &state) || !miss_along (search, inner[1].place, &inner[1].miss, &state))
    return;
  for (int step = 0; step < 40; step++)
    {
      int nearer = sign * inner[0].miss <= sign * inner[1].miss ? 0 : 1;
      if (sign * inner[nearer].miss <= 0.0)
        {
          append_between (search, first, &inner[nearer], states);
          append_between (search, &inner[nearer], last, states);
          return;
        }
      if (nearer == 0)
        {
          high = inner[1].place;
          inner[1] = inner[0];
          inner[0].place = low + golden * (high - low);
        }
      else
        {
          low = inner[0].place;
          inner[0] = inner[1];
          inner[1].place = high - golden * (high - low);
        }
      if (!miss_along (search, inner[nearer].place, &inner[nearer].miss, &state))
        return;
    }
}

static gboolean
is_crossing (const Sample *a, const Sample *b)
{
  return a->miss != 0.0 && b->miss != 0.0 && (a->miss > 0.0) != (b->miss > 0.0);
}

static gboolean
is_turning (const Sample *first, const Sample *middle, const Sample *last)
{
  return (first->miss > 0.0) == (middle->miss > 0.0) && (last->miss > 0.0) == (middle->miss > 0.0)
         && fabs (middle->miss) <= fabs (first->miss) && fabs (middle->miss) <= fabs (last->miss);
}

/* Appends every state along one stretch of places that all have a state. */
static void
find_along_stretch (const Search *search, const Sample *samples, guint n, GArray *states)
{
  for (guint i = 0; i < n; i++)
    {
      HlState state;
      if (samples[i].miss == 0.0 && state_along (search, samples[i].place, &state) == HL_OK)
        g_array_append_val (states, state);
      if (i + 1 < n && is_crossing (&samples[i], &samples[i + 1]))
        append_between (search, &samples[i], &samples[i + 1], states);
      if (i > 0 && i + 1 < n && is_turning (&samples[i - 1], &samples[i], &samples[i + 1]))
        look_at_turn (search, &samples[i - 1], &samples[i + 1], states);
    }
  /* A turn in the first or last step has no sample beyond it. */
  if (n >= 2 && !is_crossing (&samples[0], &samples[1]) && fabs (samples[0].miss) <= fabs (samples[1].miss))
    look_at_turn (search, &samples[0], &samples[1], states);
  if (n > 2 && !is_crossing (&samples[n - 2], &samples[n - 1]) && fabs (samples[n - 1].miss) <= fabs (samples[n - 2].miss))
    look_at_turn (search, &samples[n - 2], &samples[n - 1], states);
}

/* Appends every state between the two places; a place that has no state ends one stretch and begins the next. */
static void
find_states (const Search *search, double low, double high, GArray *states)
{
  Sample samples[N_STEPS + 1];
  guint n = 0;
  for (int i = 0; i <= N_STEPS; i++)
    {
      HlState state;
      samples[n].place = i == N_STEPS ? high : low + (high - low) * i / N_STEPS;
      if (miss_along (search, samples[n].place, &samples[n].miss, &state))
        n++;
      else
        {
          find_along_stretch (search, samples, n, states);
          n = 0;
        }
    }
  find_along_stretch (search, samples, n, states);
}

/* T and one of h, s, rho: the wet region first, then both sides of it. */
static void
search_at_temperature (const Search *search, GArray *states)
{
  HlFluidLimits limits;
  HlSaturation saturation;
  hl_fluid_limits (search->fluid, &limits);
  double low = log (MAX (limits.p_min, 1e-3)), high = log (limits.p_max);
  if (hl_fluid_saturation_T (search->fluid, search->held_value, &saturation) != HL_OK)
    {
      find_states (search, low, high, states);
      return;
    }

  double liquid, vapour, sought = search->sought_value;
  switch (search->sought)
    {
    case HL_STATE_H: liquid = saturation.h_liquid; vapour = saturation.h_vapour; break;
    case HL_STATE_S: liquid = saturation.s_liquid; vapour = saturation.s_vapour; break;
    default: liquid = saturation.v_liquid; vapour = saturation.v_vapour; sought = 1.0 / sought; break;
    }
  HlState state;
  double x = (sought - liquid) / (vapour - liquid), p = saturation.p;
  if (x >= 0.0 && x <= 1.0 && hl_fluid_state_Tx (search->fluid, search->held_value, x, &state) == HL_OK)
    g_array_append_val (states, state);
  /* Just beside the line, where (p,T) means one phase for certain. */
  find_states (search, low, log (p * (1.0 - 1e-9)), states);
  find_states (search, log (p * (1.0 + 1e-9)), high, states);
}

static void
search_at_pressure (const Search *search, GArray *states)
{
  HlFluidLimits limits;
  HlState cold, hot;
  hl_fluid_limits (search->fluid, &limits);
  if (hl_fluid_state_pT (search->fluid, search->held_value, limits.T_min, &cold) != HL_OK)
    return;
  /* The hottest state may end earlier at high pressure: step down to where the range still is. */
  for (double T = limits.T_max; T > limits.T_min; T -= 1.0)
    if (hl_fluid_state_pT (search->fluid, search->held_value, T, &hot) == HL_OK)
      {
        find_states (search, cold.h, hot.h, states);
        return;
      }
}

static void
search_at_quality (const Search *search, GArray *states)
{
  HlFluidLimits limits;
  hl_fluid_limits (search->fluid, &limits);
  find_states (search, limits.T_triple, limits.T_critical * (1.0 - 1e-9), states);
}

static gboolean
is_same_state (const HlState *a, const HlState *b)
{
  return fabs (a->h - b->h) < 1e-6 * (1.0 + fabs (a->h)) && fabs (a->p - b->p) < 1e-6 * a->p;
}

static char *
say_no_state (const HlFluid *fluid, HlStateKey first, double a, HlStateKey second, double b)
{
  return g_strdup_printf (_("no state of %s has %s = %.9g and %s = %.9g (SI) within %s"), hl_fluid_id (fluid), key_signs[first], a,
                          key_signs[second], b, hl_fluid_formulation (fluid));
}

static gboolean
search_states (const Search *search, HlState *state, char **message)
{
  g_autoptr(GArray) states = g_array_new (FALSE, FALSE, sizeof (HlState));
  if (search->held == HL_STATE_T)
    search_at_temperature (search, states);
  else if (search->held == HL_STATE_P)
    search_at_pressure (search, states);
  else
    search_at_quality (search, states);

  if (states->len == 0)
    {
      *message = say_no_state (search->fluid, search->held, search->held_value, search->sought, search->sought_value);
      return FALSE;
    }
  const HlState *found = &g_array_index (states, HlState, 0);
  for (guint i = 1; i < states->len; i++)
    {
      const HlState *other = &g_array_index (states, HlState, i);
      if (!is_same_state (found, other))
        {
          *message = g_strdup_printf (_("more than one state has %s = %.9g and %s = %.9g (SI): at p = %.9g Pa, T = %.9g K and at "
                                        "p = %.9g Pa, T = %.9g K; give another pair"),
                                      key_signs[search->held], search->held_value, key_signs[search->sought], search->sought_value,
                                      found->p, found->T, other->p, other->T);
          return FALSE;
        }
    }
  *state = *found;
  return TRUE;
}

static gboolean
state_straight (const HlFluid *fluid, const StraightPair *pair, double a, double b, HlState *state, char **message)
{
  HlStatus status = pair->call (fluid, a, b, state);
  if (status != HL_OK)
    *message = pair->pair != NULL ? hl_fluid_explain_failure (fluid, status, pair->pair, a, b)
                                  : say_no_state (fluid, pair->first, a, pair->second, b);
  return status == HL_OK;
}

gboolean
hl_state_from_pair (const HlFluid *fluid, HlStateKey first, double first_value, HlStateKey second, double second_value,
                    HlState *state, char **message)
{
  g_return_val_if_fail (first != second && first < HL_N_STATE_KEYS && second < HL_N_STATE_KEYS, FALSE);

  if ((first == HL_STATE_RHO && !(first_value > 0.0)) || (second == HL_STATE_RHO && !(second_value > 0.0)))
    {
      *message = g_strdup (_("a density lies above 0"));
      return FALSE;
    }
  for (guint i = 0; i < G_N_ELEMENTS (straight_pairs); i++)
    {
      const StraightPair *pair = &straight_pairs[i];
      if (pair->first == first && pair->second == second)
        return state_straight (fluid, pair, first_value, second_value, state, message);
      if (pair->first == second && pair->second == first)
        return state_straight (fluid, pair, second_value, first_value, state, message);
    }

  /* What is held, in the order of how well the search moves with it. */
  static const HlStateKey holders[] = { HL_STATE_X, HL_STATE_P, HL_STATE_T };
  for (guint i = 0; i < G_N_ELEMENTS (holders); i++)
    {
      if (first == holders[i])
        return search_states (&(Search) { fluid, first, second, first_value, second_value }, state, message);
      if (second == holders[i])
        return search_states (&(Search) { fluid, second, first, second_value, first_value }, state, message);
    }
  *message = g_strdup_printf (_("a state cannot be found from %s and %s; take p, T or x for one of them"),
                              key_signs[first], key_signs[second]);
  return FALSE;
}
