/* From the dimensionless Gibbs function of regions 1, 2 and 5 to the properties.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#pragma once
#include "fluid/if97-private.h"
#include "fluid/if97-sum.h"

#include <math.h>
G_BEGIN_DECLS

/* gamma = g/(RT) and its derivatives, each multiplied by its variables:
 * p is pi gamma_pi, pt is pi tau gamma_pi_tau, ttt is tau^3 gamma_tau_tau_tau. */
typedef struct { double one, p, pp, t, tt, pt; } HlIf97Gibbs;
typedef struct { double one, t, tt, ttt; } HlIf97GibbsT;

/* R7-97(2012), Tables 3, 12, 41: relations of the properties to gamma.  The
 * derivatives with respect to (p,h) follow from those with respect to (p,T). */
HL_IF97_INLINE void
hl_if97_state_from_gibbs (double p, double T, const HlIf97Gibbs *gamma, HlState *state)
{
  double RT = HL_IF97_R * T;
  double per_p = 1.0 / p, per_T = 1.0 / T;
  double v = RT * per_p * gamma->p;
  double cp = -HL_IF97_R * gamma->tt;
  double v_T = HL_IF97_R * per_p * (gamma->p - gamma->pt);
  double v_p = RT * per_p * per_p * gamma->pp;
  double per_cp = 1.0 / cp;
  double T_p = (T * v_T - v) * per_cp;
  double Tv_T2 = T * v_T * v_T;
  state->p = p;
  state->T = T;
  state->h = RT * gamma->t;
  state->s = HL_IF97_R * (gamma->t - gamma->one);
  state->v = v;
  state->u = RT * (gamma->t - gamma->p);
  state->cp = cp;
  state->cv = cp + Tv_T2 / v_p;
  state->w = v / sqrt (-v_p - Tv_T2 * per_cp);
  state->x = NAN;
  state->T_p = T_p;
  state->T_h = per_cp;
  state->s_p = -v * per_T;
  state->s_h = per_T;
  state->v_p = v_p + v_T * T_p;
  state->v_h = v_T * per_cp;
}

HL_IF97_INLINE void
hl_if97_caloric_from_gibbs (double T, const HlIf97GibbsT *gamma, HlIf97Caloric *caloric)
{
  caloric->h = HL_IF97_R * T * gamma->t;
  caloric->s = HL_IF97_R * (gamma->t - gamma->one);
  caloric->cp = -HL_IF97_R * gamma->tt;
  /* cp = -R tau^2 gamma_tau_tau and d tau/dT = -tau/T. */
  caloric->cp_T = HL_IF97_R * (2.0 * gamma->tt + gamma->ttt) / T;
}

G_END_DECLS
