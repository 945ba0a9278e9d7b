/* IAPWS-IF97 region 3 with other pairs than (density, T): Newton's iteration on its own equation.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "fluid/if97-private.h"

#include <math.h>

/* Densities between which every root of region 3 lies, with room to spare [kg/m3]. */
#define D_LOWEST  60.0
#define D_HIGHEST 900.0
#define MOST_STEPS 60

/* Narrows the bracket by one evaluation: is the root of this branch at a
 * higher density?  Between the spinodals (p_d <= 0) only the branch tells. */
static gboolean
root_is_denser (const HlIf97Helmholtz *f, double p, gboolean is_liquid)
{
  if (!(f->p_d > 0.0))
    return is_liquid;
  return f->p < p;
}

/**
 * hl_if97_region3_density_pT:
 * @p: pressure [Pa]
 * @T: temperature [K]
 * @start: starting density [kg/m3]; below the critical temperature, above or
 *   below the critical density, it also says whether liquid or vapour is asked for
 * @density: (out): root of p3(density, T) = p [kg/m3]
 *
 * Newton's iteration inside a bracket that shrinks with each evaluation, so
 * that it holds where the isotherm is flat near the critical point.
 *
 * Returns: HL_OK, or HL_NOT_CONVERGED
 */
HlStatus
hl_if97_region3_density_pT (double p, double T, double start, double *density)
{
  gboolean is_liquid = start > HL_IF97_D_CRITICAL;
  gboolean has_branches = T < HL_IF97_T_CRITICAL;
  double low = has_branches && is_liquid ? HL_IF97_D_CRITICAL : D_LOWEST;
  double high = has_branches && !is_liquid ? HL_IF97_D_CRITICAL : D_HIGHEST;
  double d = start;
  for (int i = 0; i < MOST_STEPS; i++)
    {
      HlIf97Helmholtz f;
      hl_if97_region3_helmholtz (d, T, &f);
      if (root_is_denser (&f, p, is_liquid))
        low = d;
      else
        high = d;
      double next = d + (p - f.p) / f.p_d;
      if (fabs (next - d) <= 1e-9 * d || high - low <= 1e-14 * d)
        {
          /* The step is quadratic: after one of 1e-9 the rest is rounding. */
          *density = fabs (next - d) <= 1e-9 * d ? next : d;
          return HL_OK;
        }
      d = f.p_d > 0.0 && next > low && next < high ? next : 0.5 * (low + high);
    }
  return HL_NOT_CONVERGED;
}

/* One step of the pair's Newton iteration, kept inside region 3's densities
 * and temperatures with room around; returns its size relative to the values. */
static double
apply_step (double *d, double *T, double step_d, double step_T)
{
  double shrink = 1.0;
  if (fabs (step_d) > 0.25 * *d)
    shrink = 0.25 * *d / fabs (step_d);
  if (fabs (step_T) * shrink > 30.0)
    shrink = 30.0 / fabs (step_T);
  *d += shrink * step_d;
  *T += shrink * step_T;
  return fmax (fabs (step_d) / *d, fabs (step_T) / *T);
}

/**
 * hl_if97_region3_ph:
 * @p: pressure [Pa]
 * @h: specific enthalpy [J/kg]
 * @density: starting density [kg/m3]
 * @T: starting temperature [K]
 * @state: (out): properties; phase is not set; untouched on failure
 *
 * Returns: HL_OK, or HL_NOT_CONVERGED
 */
HlStatus
hl_if97_region3_ph (double p, double h, double density, double T, HlState *state)
{
  for (int i = 0; i < MOST_STEPS; i++)
    {
      HlIf97Helmholtz f;
      hl_if97_region3_helmholtz (density, T, &f);
      double per_d = 1.0 / density, slope = f.p_T * per_d;
      double h_T = f.cv + slope, h_d = (f.p_d - T * slope) * per_d;
      double r_p = p - f.p, r_h = h - f.h;
      double per_det = 1.0 / (f.p_d * f.cv + T * slope * slope);
      double size = apply_step (&density, &T, (h_T * r_p - f.p_T * r_h) * per_det, (f.p_d * r_h - h_d * r_p) * per_det);
      if (size <= 1e-8)
        {
          hl_if97_region3 (density, T, state);
          state->p = p;
          state->h = h;
          return HL_OK;
        }
    }
  return HL_NOT_CONVERGED;
}

/**
 * hl_if97_region3_ps:
 * @p: pressure [Pa]
 * @s: specific entropy [J/(kg K)]
 * @density: starting density [kg/m3]
 * @T: starting temperature [K]
 * @state: (out): properties; phase is not set; untouched on failure
 *
 * Returns: HL_OK, or HL_NOT_CONVERGED
 */
HlStatus
hl_if97_region3_ps (double p, double s, double density, double T, HlState *state)
{
  for (int i = 0; i < MOST_STEPS; i++)
    {
      HlIf97Helmholtz f;
      hl_if97_region3_helmholtz (density, T, &f);
      double s_T = f.cv / T, s_d = -f.p_T / (density * density);
      double r_p = p - f.p, r_s = s - f.s;
      double per_det = 1.0 / (f.p_d * s_T - f.p_T * s_d);
      double size = apply_step (&density, &T, (s_T * r_p - f.p_T * r_s) * per_det, (f.p_d * r_s - s_d * r_p) * per_det);
      if (size <= 1e-8)
        {
          hl_if97_region3 (density, T, state);
          state->p = p;
          state->s = s;
          return HL_OK;
        }
    }
  return HL_NOT_CONVERGED;
}
