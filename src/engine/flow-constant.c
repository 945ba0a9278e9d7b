/* Flow constant of a group of turbine stages: the ellipse law.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "engine/flow-constant.h"
#include "plant/i18n.h"
#include <math.h>

/* Stodola's ellipse, as Cooke quotes it (J. Eng. Gas Turbines Power 107, 1985, 596): m sqrt (v1/p1) over sqrt (1 - (p2/p1)^2)
 * stays what it is in design while no valve moves.  The constant has the dimension of an area. */
static HlStatus
flow_constant (const HlEquation *e, G_GNUC_UNUSED const double *a, const double *x, double *r, double *dr)
{
  HlState in;
  double p1 = exp (x[1]), p2 = exp (x[3]);
  if (!(p2 < p1))
    return HL_OUTSIDE_RANGE;
  HlStatus status = hl_fluid_state_ph (e->fluid, p1, x[2], &in);
  if (status != HL_OK)
    return status;
  double f = (p1 * p1 - p2 * p2) / (p1 * in.v), root = sqrt (f), half = 0.5 * x[4] / root;
  *r = x[0] - x[4] * root;
  dr[0] = 1.0;
  dr[1] = -half * ((p1 * p1 + p2 * p2) / (p1 * in.v) - f / in.v * in.v_p * p1);
  dr[2] = half * f / in.v * in.v_h;
  dr[3] = half * 2.0 * p2 * p2 / (p1 * in.v);
  dr[4] = -root;
  return HL_OK;
}

HlEquation *
hl_add_flow_constant (HlSystem *system, const HlFluid *fluid, int flow, int p_in, int h_in, int p_out, int constant)
{
  HlEquation *e = hl_system_add_equation (system, flow_constant, HL_VAR_FLOW, 1u << 0 | 1u << 4,
                                          (const int[]) { flow, p_in, h_in, p_out, constant }, 5, NULL, 0);
  e->fluid = fluid;
  e->says = N_("{4} = {0} ÷ √((({1})² − ({3})²) ÷ ({1} × v({1}, {2})))");
  e->output = 4;
  e->source = N_("ellipse law of Stodola: Cooke, J. Eng. Gas Turbines Power 107 (1985) 596");
  return e;
}
