/* From the dimensionless Gibbs function of regions 1, 2 and 5 to the properties.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#pragma once
#include "fluid/if97-private.h"
#include "fluid/if97-sum.h"

#include <math.h>
G_BEGIN_DECLS

/* What fixes the state beside the pressure: the temperature, or the value of
 * enthalpy or entropy near to that temperature. */
typedef enum { HL_IF97_AT_T, HL_IF97_AT_H, HL_IF97_AT_S } HlIf97Given;

/* gamma = g/(RT) and its derivatives, each multiplied by its variables: p is
 * pi gamma_pi, ptt is pi tau^2 gamma_pi_tau_tau, and so on.  The third ones
 * are asked for with AT_H and AT_S only. */
typedef struct { double one, p, pp, t, tt, pt, ttt, ptt, ppt; } HlIf97Gibbs;

/* What R7-97(2012), Tables 3, 12, 41 make of gamma, as functions of (p,T). */
typedef struct { double T, h, s, v, cp, v_T, v_p; } HlIf97Basis;

/* Moves the properties along the isobar by the little that is left to the
 * value: to second order in T, h, s and v, to first order in the derivatives.
 * Returns about the relative error that this leaves in the derivatives, the
 * square of the relative change of cp and T; T, h, s and v are better by that
 * change. */
HL_IF97_INLINE double
hl_if97_shift (HlIf97Given given, double value, double p, const HlIf97Gibbs *gamma, HlIf97Basis *b)
{
  double per_T = 1.0 / b->T, per_p = 1.0 / p;
  double cp_T = HL_IF97_R * (2.0 * gamma->tt + gamma->ttt) * per_T;
  double v_TT = HL_IF97_R * per_p * per_T * gamma->ptt;
  double v_pT = HL_IF97_R * per_p * per_p * (gamma->pp - gamma->ppt);
  double per_cp = 1.0 / b->cp;
  double step, h_step, s_step;
  if (given == HL_IF97_AT_H)
    {
      h_step = value - b->h;
      step = h_step * per_cp;
      step -= 0.5 * cp_T * per_cp * step * step;
      s_step = h_step * per_T * (1.0 - 0.5 * step * per_T);
    }
  else
    {
      s_step = value - b->s;
      step = s_step * b->T * per_cp;
      step -= 0.5 * (cp_T * per_cp - per_T) * step * step;
      h_step = s_step * (b->T + 0.5 * step);
    }
  b->T += step;
  b->h = given == HL_IF97_AT_H ? value : b->h + h_step;
  b->s = given == HL_IF97_AT_S ? value : b->s + s_step;
  b->v += (b->v_T + 0.5 * v_TT * step) * step;
  b->cp += cp_T * step;
  b->v_T += v_TT * step;
  b->v_p += v_pT * step;
  double change = (fabs (cp_T) * per_cp + per_T) * step;
  return change * change;
}

/* The derivatives with respect to (p,h) follow from those with respect to (p,T). */
HL_IF97_INLINE double
hl_if97_state_from_gibbs (double p, double T, const HlIf97Gibbs *gamma, HlIf97Given given, double value, double most_left,
                          HlState *state)
{
  double RT = HL_IF97_R * T, per_p = 1.0 / p;
  HlIf97Basis b = {
    .T = T, .h = RT * gamma->t, .s = HL_IF97_R * (gamma->t - gamma->one), .v = RT * per_p * gamma->p,
    .cp = -HL_IF97_R * gamma->tt, .v_T = HL_IF97_R * per_p * (gamma->p - gamma->pt), .v_p = RT * per_p * per_p * gamma->pp,
  };
  double left = 0.0;
  if (given != HL_IF97_AT_T)
    {
      left = hl_if97_shift (given, value, p, gamma, &b);
      if (!(left <= most_left))
        return left;
    }
  double per_T = 1.0 / b.T, per_cp = 1.0 / b.cp;
  double T_p = (b.T * b.v_T - b.v) * per_cp;
  double cv_v_p = b.cp * b.v_p + b.T * b.v_T * b.v_T;
  state->p = p;
  state->T = b.T;
  state->h = b.h;
  state->s = b.s;
  state->v = b.v;
  state->u = b.h - p * b.v;
  state->cp = b.cp;
  state->cv = cv_v_p / b.v_p;
  state->w = b.v * sqrt (b.cp / -cv_v_p);
  state->x = NAN;
  state->T_p = T_p;
  state->T_h = per_cp;
  state->s_p = -b.v * per_T;
  state->s_h = per_T;
  state->v_p = b.v_p + b.v_T * T_p;
  state->v_h = b.v_T * per_cp;
  return left;
}

/* The four faces of a region: forward, near to a given h or s, and h or s with
 * cp alone. */
#define HL_IF97_DEFINE_REGION(region) \
  void \
  hl_if97_##region (double p, double T, HlState *state) \
  { \
    evaluate (p, T, HL_IF97_AT_T, 0.0, 0.0, state); \
  } \
  double \
  hl_if97_##region##_at_h (double p, double T, double h, double most_left, HlState *state) \
  { \
    return evaluate (p, T, HL_IF97_AT_H, h, most_left, state); \
  } \
  double \
  hl_if97_##region##_at_s (double p, double T, double s, double most_left, HlState *state) \
  { \
    return evaluate (p, T, HL_IF97_AT_S, s, most_left, state); \
  } \
  double \
  hl_if97_##region##_enthalpy (double p, double T, double *cp) \
  { \
    double one, t; \
    evaluate_calorics (p, T, FALSE, &one, &t, cp); \
    return HL_IF97_R * T * t; \
  } \
  double \
  hl_if97_##region##_entropy (double p, double T, double *cp) \
  { \
    double one, t; \
    evaluate_calorics (p, T, TRUE, &one, &t, cp); \
    return HL_IF97_R * (t - one); \
  }

G_END_DECLS
