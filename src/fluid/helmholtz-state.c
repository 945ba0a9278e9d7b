/* All properties of one phase from density and temperature by a Helmholtz equation of state.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "fluid/helmholtz-private.h"

#include <math.h>

/* Properties by the usual relations (for instance IAPWS R6-95(2018), Table 3).
 * Derivatives of T and v at constant h or p are written over
 *   D = cv p_d + T (p_T/d)^2 = cp p_d,
 * which stays finite at the critical point, where p_d = 0 and cp has no bound. */
void
hl_helmholtz_state (const HlHelmholtz *eq, double density, double T, HlState *state)
{
  HlAlpha ideal;
  hl_helmholtz_ideal (eq, eq->T_reducing / T, &ideal);
  hl_helmholtz_state_with (eq, density, T, &ideal, state);
}

void
hl_helmholtz_state_with (const HlHelmholtz *eq, double density, double T, const HlAlpha *ideal_part, HlState *state)
{
  HlAlpha ideal = *ideal_part, residual;
  double delta = density / eq->d_reducing, tau = eq->T_reducing / T, RT = eq->R * T;
  hl_helmholtz_residual (eq, delta, tau, &residual);

  double v = 1.0 / density;
  double u = RT * (ideal.t + residual.t);
  double p = density * RT * (1.0 + residual.d);
  double p_d = RT * (1.0 + 2.0 * residual.d + residual.dd);
  double p_T = density * eq->R * (1.0 + residual.d - residual.dt);
  double cv = -eq->R * (ideal.tt + residual.tt);
  double p_T_v = p_T * v, heat = cv * p_d + T * p_T_v * p_T_v;      /* heat = D above */
  double per_heat = 1.0 / heat;
  state->p = p;
  state->T = T;
  state->v = v;
  state->u = u;
  state->h = u + RT * (1.0 + residual.d);
  state->s = eq->R * (ideal.t + residual.t - ideal.a - residual.a - log (delta));
  state->cv = cv;
  state->cp = heat / p_d;
  state->w = sqrt (heat / cv);
  state->x = NAN;
  state->T_h = p_d * per_heat;
  state->T_p = (T * p_T_v * v - v * p_d) * per_heat;
  state->s_h = 1.0 / T;
  state->s_p = -v / T;
  state->v_h = p_T_v * v * per_heat;
  state->v_p = -v * v * (v * p_T + cv) * per_heat;
}

void
hl_helmholtz_pressure (const HlHelmholtz *eq, double density, double T, double *p, double *p_d)
{
  HlAlpha residual;
  double RT = eq->R * T;
  hl_helmholtz_residual (eq, density / eq->d_reducing, eq->T_reducing / T, &residual);
  *p = density * RT * (1.0 + residual.d);
  *p_d = RT * (1.0 + 2.0 * residual.d + residual.dd);
}

HlPhase
hl_helmholtz_phase (const HlHelmholtz *eq, double p, double T, gboolean is_liquid)
{
  if (is_liquid)
    return HL_PHASE_LIQUID;
  if (T <= eq->Tc && p > eq->pc)
    return HL_PHASE_LIQUID;
  return p > eq->pc ? HL_PHASE_SUPERCRITICAL : HL_PHASE_VAPOUR;
}
