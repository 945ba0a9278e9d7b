/* Where a medium's states lie, so that searches begin, step and end where the medium is; SI.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "engine/fluid-scale.h"
#include <math.h>

/* Water boils at 5 bar at 0.656 of its critical temperature; other media are started at the same part of theirs. */
#define USUAL_SHARE 0.656
/* Saturated liquid and vapour of water there, against which enthalpies stated for water are placed. */
#define WATER_LIQUID 640e3
#define WATER_STEP   2108e3
/* Share of the way from the lower end of the range up to the critical temperature, where the usual one lies below the range. */
#define LEAST_SHARE 0.4

static void
take (double *low, double *high, double value)
{
  if (!isfinite (value))
    return;
  *low = fmin (*low, value);
  *high = fmax (*high, value);
}

static void
take_state (HlFluidScale *scale, const HlState *state)
{
  take (&scale->h_low, &scale->h_high, state->h);
  take (&scale->s_low, &scale->s_high, state->s);
  take (&scale->v_low, &scale->v_high, state->v);
}

/* Corners and edges of the published range. */
static void
look_at_range (HlFluidScale *scale, const HlFluidLimits *limits)
{
  const double ln_low = log (scale->p_low), ln_high = log (scale->p_high);
  scale->h_low = scale->s_low = scale->v_low = INFINITY;
  scale->h_high = scale->s_high = scale->v_high = -INFINITY;
  for (int i = 0; i <= 8; i++)
    for (int k = 0; k <= 8; k++)
      {
        HlState state;
        double T = limits->T_min + (limits->T_max - limits->T_min) * i / 8.0;
        if (hl_fluid_state_pT (scale->fluid, exp (ln_low + (ln_high - ln_low) * k / 8.0), T, &state) == HL_OK)
          take_state (scale, &state);
      }
}

/* The cold start: a boiling state where there is one, else a gas of moderate temperature. */
static void
look_at_boiling (HlFluidScale *scale, const HlFluidLimits *limits)
{
  HlSaturation sat;
  double T = fmax (USUAL_SHARE * limits->T_critical, limits->T_min + LEAST_SHARE * (limits->T_critical - limits->T_min));
  if (limits->T_critical > limits->T_min && hl_fluid_saturation_T (scale->fluid, T, &sat) == HL_OK)
    {
      scale->p_usual = sat.p;
      scale->T_usual = sat.T;
      scale->h_liquid = sat.h_liquid;
      scale->h_step = sat.h_vapour - sat.h_liquid;
      return;
    }
  HlState cool, warm;
  scale->p_usual = 1.5e5;
  scale->T_usual = fmin (fmax (450.0, limits->T_min), limits->T_max);
  scale->h_liquid = 0.0;
  scale->h_step = WATER_STEP;
  double T_cool = fmax (limits->T_min, 300.0), T_warm = fmin (limits->T_max, T_cool + 300.0);
  if (hl_fluid_state_pT (scale->fluid, scale->p_usual, T_cool, &cool) == HL_OK
      && hl_fluid_state_pT (scale->fluid, scale->p_usual, T_warm, &warm) == HL_OK && warm.h > cool.h)
    {
      scale->h_liquid = cool.h;
      scale->h_step = warm.h - cool.h;
    }
}

static HlFluidScale *
measure (const HlFluid *fluid)
{
  HlFluidScale *scale = g_new0 (HlFluidScale, 1);
  HlFluidLimits limits;
  hl_fluid_limits (fluid, &limits);
  scale->fluid = fluid;
  scale->T_low = limits.T_min;
  scale->T_high = limits.T_max;
  scale->p_high = limits.p_max;
  scale->p_low = fmax (limits.p_min, 1e-7 * limits.p_max);
  if (limits.p_triple > 0.0 && isfinite (limits.p_triple))
    scale->p_low = fmax (limits.p_min, fmin (limits.p_triple, 1e3));
  look_at_range (scale, &limits);
  look_at_boiling (scale, &limits);
  double slack = 0.02 * (scale->h_high - scale->h_low);
  scale->h_low -= slack;
  scale->h_high += slack;
  return scale;
}

/* What has always served for water, by both of its formulations. */
static const HlFluidScale water = {
  .p_low = 611.7, .p_high = 1e8, .h_low = 100.0, .h_high = 7.3e6, .s_low = -8.0, .s_high = 13e3, .v_low = 9e-4, .v_high = 2e3,
  .T_low = 273.16, .T_high = 2273.15, .p_usual = 5e5, .T_usual = 400.0, .h_liquid = WATER_LIQUID, .h_step = WATER_STEP,
};

const HlFluidScale *
hl_fluid_scale (const HlFluid *fluid)
{
  static GMutex lock;
  static GHashTable *known;
  if (fluid == hl_fluid_water ())
    return &water;
  g_mutex_lock (&lock);
  if (known == NULL)
    known = g_hash_table_new (g_direct_hash, g_direct_equal);
  HlFluidScale *scale = g_hash_table_lookup (known, fluid);
  if (scale == NULL)
    {
      scale = measure (fluid);
      g_hash_table_insert (known, (gpointer) fluid, scale);
    }
  g_mutex_unlock (&lock);
  return scale;
}

double
hl_fluid_scale_enthalpy (const HlFluidScale *scale, double h_water)
{
  if (scale == &water)
    return h_water;
  return scale->h_liquid + (h_water - WATER_LIQUID) / WATER_STEP * scale->h_step;
}
