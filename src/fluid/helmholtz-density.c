/* Density at given pressure and temperature, on a branch that is chosen beforehand; states by (p,T) and (density,T).
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "fluid/helmholtz-private.h"

#include <math.h>

#define MAX_STEPS 100
#define STEP_DONE 1e-11         /* relative; Newton's next step would be its square */
#define NEAR_THE_LINE 1e-4      /* in ln p: closer than this the line is solved exactly */

/* Root of Z^3 + a Z^2 + b Z + c, the largest or smallest real one. */
static double
cubic_root (double a, double b, double c, gboolean is_largest)
{
  double shift = -a / 3.0;
  double q = (a * a - 3.0 * b) / 9.0, r = (a * (2.0 * a * a - 9.0 * b) + 27.0 * c) / 54.0;
  if (r * r < q * q * q)
    {
      double root = sqrt (q), angle = acos (r / (q * root)) / 3.0;
      return shift - 2.0 * root * cos (is_largest ? angle + 2.0 * G_PI / 3.0 : angle);
    }
  double big = cbrt (fabs (r) + sqrt (r * r - q * q * q));
  if (r > 0.0)
    big = -big;
  return shift + big + (fabs (big) > 0.0 ? q / big : 0.0);
}

/* Start from the cubic equation of Peng and Robinson (Ind. Eng. Chem. Fundam. 15
 * (1976) 59), which needs the critical point and the acentric factor only. */
static double
start_density (const HlHelmholtz *eq, double p, double T)
{
  double w = eq->acentric_factor, Tr = T / eq->Tc, pr = p / eq->pc;
  double kappa = 0.37464 + w * (1.54226 - 0.26992 * w);
  double alpha = 1.0 + kappa * (1.0 - sqrt (Tr));
  double A = 0.45724 * alpha * alpha * pr / (Tr * Tr), B = 0.07780 * pr / Tr;
  double Z = cubic_root (B - 1.0, A - B * (2.0 + 3.0 * B), -B * (A - B * (1.0 + B)), TRUE);
  return p / (fmax (Z, 1.05 * B) * eq->R * T);
}

/* The part of the isotherm on which pressure rises with density, and a start on it. */
static void
bracket (const HlHelmholtz *eq, double p, double T, HlBranch branch, double *low, double *high, double *start)
{
  *low = 0.0;
  *high = INFINITY;
  if (branch == HL_BRANCH_ABOVE)
    {
      *start = start_density (eq, p, T);
      return;
    }
  /* A little beyond the line: the table is that good, and pressure still rises there. */
  double zeta = hl_helmholtz_zeta_of_T (eq, T);
  double margin = 1e-6 * fmin (1.0, zeta);
  if (branch == HL_BRANCH_LIQUID)
    {
      *low = exp (hl_helmholtz_table (eq, HL_SAT_LN_D_LIQUID, zeta)) * (1.0 - margin);
      *start = *low * (1.0 + 2.0 * margin);
    }
  else
    {
      double p_sat = exp (hl_helmholtz_table (eq, HL_SAT_LN_P, zeta));
      *high = exp (hl_helmholtz_table (eq, HL_SAT_LN_D_VAPOUR, zeta)) * (1.0 + margin);
      /* Z is near 1 - (1 - Z'') p/p_sat. */
      double Z = 1.0 - (1.0 - p_sat / (*high * eq->R * T)) * fmin (1.0, p / p_sat);
      *start = fmin (p / (Z * eq->R * T), *high);
    }
}

/**
 * hl_helmholtz_density:
 * @eq: an equation
 * @p: pressure [Pa], above 0
 * @T: temperature [K]
 * @branch: liquid or vapour below the critical temperature, above it "above"
 * @density: (out): [kg/m3]; untouched on failure
 *
 * Newton's method between bounds inside which pressure rises with density; the
 * bounds close in with every step, so no step can reach another branch.
 *
 * Returns: HL_OK or HL_NOT_CONVERGED
 */
HlStatus
hl_helmholtz_density (const HlHelmholtz *eq, double p, double T, HlBranch branch, double *density)
{
  double low, high, d;
  bracket (eq, p, T, branch, &low, &high, &d);
  for (int i = 0; i < MAX_STEPS; i++)
    {
      double p_here, p_d, next;
      hl_helmholtz_pressure (eq, d, T, &p_here, &p_d);
      double miss = p - p_here;
      if (miss > 0.0)
        low = d;
      else
        high = d;
      /* ln p over ln d is nearly straight in a gas. */
      if (branch == HL_BRANCH_LIQUID || !(p_here > 0.0))
        next = p_d > 0.0 ? d + miss / p_d : -1.0;
      else
        next = p_d > 0.0 ? d * exp (log (p / p_here) * p_here / (d * p_d)) : -1.0;
      double step = fabs (next - d);
      if (p_d > 0.0 && step <= STEP_DONE * d)
        {
          *density = next;
          return HL_OK;
        }
      if (!(next > low && next < high && next < 1.5 * d))
        next = isinf (high) ? 1.2 * d : 0.5 * (low + high);
      if (isfinite (high) && high - low <= 4e-16 * high)
        {
          *density = next;
          return HL_OK;
        }
      d = next;
    }
  return HL_NOT_CONVERGED;
}

/* Liquid or vapour at a pair below the critical temperature; the line itself counts as liquid. */
static HlStatus
branch_at (const HlHelmholtz *eq, double p, double T, HlBranch *branch)
{
  *branch = HL_BRANCH_ABOVE;
  if (T >= eq->Tc)
    return HL_OK;
  *branch = HL_BRANCH_LIQUID;
  if (p >= eq->pc)
    return HL_OK;
  double away = log (p) - hl_helmholtz_table (eq, HL_SAT_LN_P, hl_helmholtz_zeta_of_T (eq, T));
  if (fabs (away) < NEAR_THE_LINE)
    {
      HlSaturatedPair pair;
      HlStatus status = hl_helmholtz_saturate_T (eq, T, &pair);
      if (status != HL_OK)
        return status;
      away = p - pair.p;
    }
  if (away < 0.0)
    *branch = HL_BRANCH_VAPOUR;
  return HL_OK;
}

HlStatus
hl_helmholtz_state_pT (const HlFluid *fluid, double p, double T, HlState *state)
{
  const HlHelmholtz *eq = hl_helmholtz_of (fluid);
  HlBranch branch;
  HlStatus status;
  double density;
  if (!(p > 0.0 && p <= eq->p_max && T >= eq->T_min && T <= eq->T_max))
    return HL_OUTSIDE_RANGE;
  if ((status = branch_at (eq, p, T, &branch)) != HL_OK || (status = hl_helmholtz_density (eq, p, T, branch, &density)) != HL_OK)
    return status;
  hl_helmholtz_state (eq, density, T, state);
  state->p = p;
  state->phase = hl_helmholtz_phase (eq, p, T, branch == HL_BRANCH_LIQUID);
  return HL_OK;
}

HlStatus
hl_helmholtz_state_dT (const HlFluid *fluid, double density, double T, HlState *state)
{
  const HlHelmholtz *eq = hl_helmholtz_of (fluid);
  HlState here;
  if (!(density > 0.0 && isfinite (density) && T >= eq->T_min && T <= eq->T_max))
    return HL_OUTSIDE_RANGE;
  gboolean is_liquid = FALSE;
  double p_sat = 0.0;
  if (T < eq->Tc)
    {
      HlSaturatedPair pair;
      HlStatus status = hl_helmholtz_saturate_T (eq, T, &pair);
      if (status != HL_OK)
        return status;
      if (density < pair.d_liquid && density > pair.d_vapour)
        {
          HlSaturation saturation;
          hl_helmholtz_saturation_from_pair (eq, &pair, &saturation);
          double x = (1.0 / density - saturation.v_liquid) / (saturation.v_vapour - saturation.v_liquid);
          hl_helmholtz_mix (&saturation, x, state);
          return HL_OK;
        }
      is_liquid = density >= pair.d_liquid;
      p_sat = pair.p;
    }
  hl_helmholtz_state (eq, density, T, &here);
  /* In a cold liquid p is a difference of large numbers; beyond the line it is at least that of the line. */
  if (is_liquid)
    here.p = fmax (here.p, p_sat);
  /* The same rounding must not refuse the highest pressure itself. */
  if (here.p > eq->p_max && here.p - eq->p_max <= 1e-12 * density * density * eq->R * T / eq->dc + 1e-10 * eq->p_max)
    here.p = eq->p_max;
  if (!(here.p > 0.0 && here.p <= eq->p_max))
    return HL_OUTSIDE_RANGE;
  here.phase = hl_helmholtz_phase (eq, here.p, T, is_liquid);
  *state = here;
  return HL_OK;
}
