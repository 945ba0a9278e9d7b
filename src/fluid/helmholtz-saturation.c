/* Saturation of a Helmholtz fluid: equal pressure and Gibbs energy of liquid and vapour; states on and inside the dome.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "fluid/helmholtz-private.h"

#include <math.h>

/* Below this zeta (within 1e-7 Tc of the critical point) both densities lie so
 * close that rounding of the pressures would move them: the table's curves, which
 * end in the critical point, are the answer there. */
#define ZETA_TABLE 3e-4
#define LARGEST_STEP 0.2        /* relative to the density */
#define STEP_DONE 3e-8          /* relative; what is left is its square */
#define ZETA_ONE_STEP 0.05      /* below this (0.25 % of Tc) the curvature of p(d) counts too much for one step */
#define ONE_STEP_DONE 1e-7      /* relative to the volume */

typedef struct {
  double p, p_d, p_T, a, s;     /* a and s without the ideal part that both phases share, divided by R T and R */
} Side;

static void
side_at (const HlHelmholtz *eq, double density, double T, Side *side)
{
  HlAlpha residual;
  double delta = density / eq->d_reducing, RT = eq->R * T;
  hl_helmholtz_residual (eq, delta, eq->T_reducing / T, &residual);
  side->p = density * RT * (1.0 + residual.d);
  side->p_d = RT * (1.0 + 2.0 * residual.d + residual.dd);
  side->p_T = density * eq->R * (1.0 + residual.d - residual.dt);
  side->a = log (delta) + residual.a;
  side->s = residual.t - residual.a - log (delta);
}

static double
limit_step (double step, double value)
{
  double largest = LARGEST_STEP * value;
  return CLAMP (step, -largest, largest);
}

/* Adds the steps; TRUE where both were small.  Fails where a phase lost its
 * stability or crossed the critical density. */
static gboolean
take_steps (const HlHelmholtz *eq, HlSaturatedPair *pair, double d_liquid, double d_vapour, double done, gboolean *has_failed)
{
  /* The two densities stay on both sides of the critical one. */
  d_liquid = limit_step (d_liquid, fmin (pair->d_liquid, 4.0 * (pair->d_liquid - eq->dc)));
  d_vapour = limit_step (d_vapour, fmin (pair->d_vapour, 4.0 * (eq->dc - pair->d_vapour)));
  pair->d_liquid += d_liquid;
  pair->d_vapour += d_vapour;
  *has_failed = !(isfinite (d_liquid) && isfinite (d_vapour));
  return fabs (d_liquid) <= done * pair->d_liquid && fabs (d_vapour) <= done * pair->d_vapour;
}

/* How small a step must be: close to the critical point the curvature of p(d)
 * counts more, the square of the step relative to the width of the dome. */
static double
step_done (const HlHelmholtz *eq, double T)
{
  return STEP_DONE * fmin (1.0, hl_helmholtz_zeta_of_T (eq, T) * 3.0);
}

/* Newton's method in both densities at fixed temperature.  Equal Gibbs energies
 * at the common pressure P give P = (a'' - a')/(v' - v''), and each density
 * follows by its own compressibility. */
gboolean
hl_helmholtz_polish_T (const HlHelmholtz *eq, HlSaturatedPair *pair, guint max_steps)
{
  double done = step_done (eq, pair->T), last = INFINITY;
  for (guint i = 0; i < max_steps; i++)
    {
      Side liquid, vapour;
      gboolean has_failed;
      side_at (eq, pair->d_liquid, pair->T, &liquid);
      side_at (eq, pair->d_vapour, pair->T, &vapour);
      if (!(liquid.p_d > 0.0) || !(vapour.p_d > 0.0))
        {
          /* Inside the spinodals: away from the critical density. */
          if (!(liquid.p_d > 0.0))
            pair->d_liquid += 0.1 * (pair->d_liquid - eq->dc);
          if (!(vapour.p_d > 0.0))
            pair->d_vapour -= 0.1 * fmin (eq->dc - pair->d_vapour, pair->d_vapour);
          continue;
        }
      double RT = eq->R * pair->T;
      double p = RT * (vapour.a - liquid.a) / (1.0 / pair->d_liquid - 1.0 / pair->d_vapour);
      pair->p = p;
      double step_liquid = (p - liquid.p) / liquid.p_d, step_vapour = (p - vapour.p) / vapour.p_d;
      double size = fmax (fabs (step_liquid) / pair->d_liquid, fabs (step_vapour) / pair->d_vapour);
      if (take_steps (eq, pair, step_liquid, step_vapour, done, &has_failed))
        return p > 0.0;
      /* Rounding ends the progress close to the critical point. */
      if (has_failed || (i > 8 && size < 1e-6 && size >= last))
        return !has_failed && p > 0.0;
      last = size;
    }
  return FALSE;
}

/* The same with the pressure given and the temperature sought: along each phase
 * dg = -s dT + v dp, so the temperature moves by the difference of g over that of s. */
static gboolean
polish_p (const HlHelmholtz *eq, HlSaturatedPair *pair, guint max_steps)
{
  double done = step_done (eq, pair->T), last = INFINITY;
  for (guint i = 0; i < max_steps; i++)
    {
      Side liquid, vapour;
      gboolean has_failed;
      side_at (eq, pair->d_liquid, pair->T, &liquid);
      side_at (eq, pair->d_vapour, pair->T, &vapour);
      if (!(liquid.p_d > 0.0) || !(vapour.p_d > 0.0))
        return FALSE;
      double g_difference = eq->R * pair->T * (liquid.a - vapour.a) + pair->p * (1.0 / pair->d_liquid - 1.0 / pair->d_vapour);
      double T_step = g_difference / (eq->R * (liquid.s - vapour.s));
      T_step = CLAMP (T_step, -0.05 * pair->T, 0.05 * pair->T);
      double step_liquid = (pair->p - liquid.p - liquid.p_T * T_step) / liquid.p_d;
      double step_vapour = (pair->p - vapour.p - vapour.p_T * T_step) / vapour.p_d;
      double size = fmax (fabs (step_liquid) / pair->d_liquid, fabs (step_vapour) / pair->d_vapour);
      pair->T += T_step;
      if (take_steps (eq, pair, step_liquid, step_vapour, done, &has_failed) && fabs (T_step) < 1e-9 * pair->T)
        return TRUE;
      if (has_failed || (i > 8 && size < 1e-6 && size >= last))
        return !has_failed;
      last = size;
    }
  return FALSE;
}

static void
pair_from_table (const HlHelmholtz *eq, double zeta, HlSaturatedPair *pair)
{
  pair->d_liquid = exp (hl_helmholtz_table (eq, HL_SAT_LN_D_LIQUID, zeta));
  pair->d_vapour = exp (hl_helmholtz_table (eq, HL_SAT_LN_D_VAPOUR, zeta));
}

HlStatus
hl_helmholtz_saturate_T (const HlHelmholtz *eq, double T, HlSaturatedPair *pair)
{
  double zeta = hl_helmholtz_zeta_of_T (eq, T);
  HlSaturatedPair found = { .T = T };
  pair_from_table (eq, zeta, &found);
  if (zeta < ZETA_TABLE)
    found.p = exp (hl_helmholtz_table (eq, HL_SAT_LN_P, zeta));
  else if (!hl_helmholtz_polish_T (eq, &found, 30))
    return HL_NOT_CONVERGED;
  *pair = found;
  return HL_OK;
}

HlStatus
hl_helmholtz_saturate_p (const HlHelmholtz *eq, double p, HlSaturatedPair *pair)
{
  double zeta = hl_helmholtz_zeta_of_p (eq, p);
  HlSaturatedPair found = { .T = hl_helmholtz_T_of_zeta (eq, zeta), .p = p };
  pair_from_table (eq, zeta, &found);
  if (zeta >= ZETA_TABLE && !polish_p (eq, &found, 30))
    return HL_NOT_CONVERGED;
  *pair = found;
  return HL_OK;
}

/* Slopes along the line by Clausius and Clapeyron; at the critical point, where
 * both phases are one, the slope is that of its isochore. */
static void
saturation_from_ends (const HlState *liquid, const HlState *vapour, HlSaturation *saturation)
{
  double T_p;
  if (vapour->s > liquid->s && vapour->v > liquid->v)
    T_p = (vapour->v - liquid->v) / (vapour->s - liquid->s);
  else
    T_p = liquid->T_p - liquid->T_h * liquid->v_p / liquid->v_h;    /* dT/dp at constant volume */
  double h_liquid_p = (T_p - liquid->T_p) / liquid->T_h, h_vapour_p = (T_p - vapour->T_p) / vapour->T_h;
  *saturation = (HlSaturation) {
    .p = liquid->p, .T = liquid->T, .T_p = T_p,
    .h_liquid = liquid->h, .s_liquid = liquid->s, .v_liquid = liquid->v,
    .h_vapour = vapour->h, .s_vapour = vapour->s, .v_vapour = vapour->v,
    .h_liquid_p = h_liquid_p, .h_vapour_p = h_vapour_p,
    .s_liquid_p = (h_liquid_p - liquid->v) / liquid->T, .s_vapour_p = (h_vapour_p - vapour->v) / liquid->T,
    .v_liquid_p = liquid->v_p + liquid->v_h * h_liquid_p, .v_vapour_p = vapour->v_p + vapour->v_h * h_vapour_p,
  };
}

static void
ends_at (const HlHelmholtz *eq, double T, double d_liquid, double d_vapour, HlState *liquid, HlState *vapour)
{
  HlAlpha ideal;
  hl_helmholtz_ideal (eq, eq->T_reducing / T, &ideal);
  hl_helmholtz_state_with (eq, d_liquid, T, &ideal, liquid);
  hl_helmholtz_state_with (eq, d_vapour, T, &ideal, vapour);
}

void
hl_helmholtz_saturation_from_pair (const HlHelmholtz *eq, const HlSaturatedPair *pair, HlSaturation *saturation)
{
  HlState liquid, vapour;
  ends_at (eq, pair->T, pair->d_liquid, pair->d_vapour, &liquid, &vapour);
  liquid.p = vapour.p = pair->p;
  saturation_from_ends (&liquid, &vapour, saturation);
}

/* Moves a state to first order to where its pressure is p and its temperature T; how far, relative. */
static double
move_end (double p, double T, HlState *end)
{
  double dp = p - end->p, dh = (T - end->T - end->T_p * dp) / end->T_h, dv = end->v_p * dp + end->v_h * dh;
  end->s += (dh - end->v * dp) / end->T;
  end->h += dh;
  end->v += dv;
  end->p = p;
  end->T = T;
  return fabs (dv) / end->v;
}

/* From the table's densities, which lie within some 1e-8, one step of Newton's method
 * leads to the line to all digits: along each phase dg = -s dT + v dp.  The slopes stay
 * those of the table's point, as good as the step.  FALSE where the step is not small. */
static gboolean
saturation_by_one_step (const HlHelmholtz *eq, double p, double zeta, HlSaturation *saturation)
{
  HlState liquid, vapour;
  HlSaturatedPair pair;
  double T = hl_helmholtz_T_of_zeta (eq, zeta);
  pair_from_table (eq, zeta, &pair);
  ends_at (eq, T, pair.d_liquid, pair.d_vapour, &liquid, &vapour);
  if (!(liquid.T_h > 0.0) || !(vapour.T_h > 0.0))
    return FALSE;
  double g_difference = (liquid.h - vapour.h) - T * (liquid.s - vapour.s) + liquid.v * (p - liquid.p) - vapour.v * (p - vapour.p);
  double T_step = g_difference / (liquid.s - vapour.s);
  if (!(fabs (T_step) < STEP_DONE * T))
    return FALSE;
  double liquid_step = move_end (p, T + T_step, &liquid), vapour_step = move_end (p, T + T_step, &vapour);
  if (!(fmax (liquid_step, vapour_step) < ONE_STEP_DONE))
    return FALSE;
  saturation_from_ends (&liquid, &vapour, saturation);
  return TRUE;
}

/**
 * hl_helmholtz_saturation_at:
 * @eq: an equation
 * @p: pressure on the line [Pa]
 * @zeta: hl_helmholtz_zeta_of_p() of it
 * @saturation: (out): both ends; untouched on failure
 *
 * Returns: HL_OK or HL_NOT_CONVERGED
 */
HlStatus
hl_helmholtz_saturation_at (const HlHelmholtz *eq, double p, double zeta, HlSaturation *saturation)
{
  HlSaturatedPair pair;
  if (zeta > ZETA_ONE_STEP && saturation_by_one_step (eq, p, zeta, saturation))
    return HL_OK;
  HlStatus status = hl_helmholtz_saturate_p (eq, p, &pair);
  if (status == HL_OK)
    hl_helmholtz_saturation_from_pair (eq, &pair, saturation);
  return status;
}

/* Equilibrium mixture.  The line is exactly consistent here, so s_h = 1/T and s_p = -v/T hold as in one phase. */
void
hl_helmholtz_mix (const HlSaturation *saturation, double x, HlState *state)
{
  const HlSaturation *sat = saturation;
  double h_span = sat->h_vapour - sat->h_liquid, v_span = sat->v_vapour - sat->v_liquid;
  double x_p = -((1.0 - x) * sat->h_liquid_p + x * sat->h_vapour_p) / h_span;
  double v = sat->v_liquid + x * v_span, h = sat->h_liquid + x * h_span;
  *state = (HlState) {
    .p = sat->p, .T = sat->T, .h = h, .s = sat->s_liquid + x * (sat->s_vapour - sat->s_liquid), .v = v, .u = h - sat->p * v,
    .cp = NAN, .cv = NAN, .w = NAN, .x = x,
    .T_p = sat->T_p, .T_h = 0.0, .s_h = 1.0 / sat->T, .s_p = -v / sat->T,
    .v_h = v_span / h_span, .v_p = (1.0 - x) * sat->v_liquid_p + x * sat->v_vapour_p + v_span * x_p,
    .phase = HL_PHASE_TWO_PHASE,
  };
}

/* The ends are given whole, as saturated liquid and vapour; at the critical point they are one. */
static HlStatus
state_on_pair (const HlHelmholtz *eq, const HlSaturatedPair *pair, double x, HlState *state)
{
  if (x > 0.0 && x < 1.0 && pair->d_liquid > pair->d_vapour)
    {
      HlSaturation saturation;
      hl_helmholtz_saturation_from_pair (eq, pair, &saturation);
      hl_helmholtz_mix (&saturation, x, state);
      return HL_OK;
    }
  hl_helmholtz_state (eq, x > 0.0 ? pair->d_vapour : pair->d_liquid, pair->T, state);
  state->p = pair->p;
  state->x = x;
  state->phase = x > 0.0 ? HL_PHASE_VAPOUR : HL_PHASE_LIQUID;
  return HL_OK;
}

static gboolean
has_saturation_p (const HlHelmholtz *eq, double p)
{
  return p >= eq->p_min_sat && p <= eq->pc;
}

static gboolean
has_saturation_T (const HlHelmholtz *eq, double T)
{
  return T >= eq->T_min && T <= eq->Tc;
}

HlStatus
hl_helmholtz_saturation_p (const HlFluid *fluid, double p, HlSaturation *saturation)
{
  const HlHelmholtz *eq = hl_helmholtz_of (fluid);
  if (!has_saturation_p (eq, p))
    return HL_OUTSIDE_RANGE;
  return hl_helmholtz_saturation_at (eq, p, hl_helmholtz_zeta_of_p (eq, p), saturation);
}

HlStatus
hl_helmholtz_saturation_T (const HlFluid *fluid, double T, HlSaturation *saturation)
{
  const HlHelmholtz *eq = hl_helmholtz_of (fluid);
  HlSaturatedPair pair;
  if (!has_saturation_T (eq, T))
    return HL_OUTSIDE_RANGE;
  HlStatus status = hl_helmholtz_saturate_T (eq, T, &pair);
  if (status == HL_OK)
    hl_helmholtz_saturation_from_pair (eq, &pair, saturation);
  return status;
}

HlStatus
hl_helmholtz_state_px (const HlFluid *fluid, double p, double x, HlState *state)
{
  const HlHelmholtz *eq = hl_helmholtz_of (fluid);
  HlSaturatedPair pair;
  if (!(has_saturation_p (eq, p) && x >= 0.0 && x <= 1.0))
    return HL_OUTSIDE_RANGE;
  HlStatus status = hl_helmholtz_saturate_p (eq, p, &pair);
  return status == HL_OK ? state_on_pair (eq, &pair, x, state) : status;
}

HlStatus
hl_helmholtz_state_Tx (const HlFluid *fluid, double T, double x, HlState *state)
{
  const HlHelmholtz *eq = hl_helmholtz_of (fluid);
  HlSaturatedPair pair;
  if (!(has_saturation_T (eq, T) && x >= 0.0 && x <= 1.0))
    return HL_OUTSIDE_RANGE;
  HlStatus status = hl_helmholtz_saturate_T (eq, T, &pair);
  return status == HL_OK ? state_on_pair (eq, &pair, x, state) : status;
}
