/* Expansion whose wet part loses efficiency with moisture, by Baumann's rule.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "engine/wet-expansion.h"
#include "plant/i18n.h"
#include <math.h>

/* Derivatives to ln p_in, h_in, ln p_out, efficiency, factor, h_out. */
enum { P_IN, H_IN, P_OUT, EFFICIENCY, FACTOR, H_OUT, N };

typedef struct { double v, d[N]; } Dual;

/* Where the wet part begins: enthalpy, entropy, moisture. */
typedef struct { Dual h, s, y; } WetStart;

static double
moisture_slopes (const HlSaturation *sat, double h, double *to_ln_p, double *to_h)
{
  double span = sat->h_vapour - sat->h_liquid, y = (sat->h_vapour - h) / span;
  *to_ln_p = sat->p * (sat->h_vapour_p - y * (sat->h_vapour_p - sat->h_liquid_p)) / span;
  *to_h = -1.0 / span;
  return y;
}

/* The dry line h_in - efficiency (h_in - h(p, s_in)) meets the saturation line between p_out and p_in: bisection with Newton's
 * step inside.  Below, the line lies under the saturated vapour; above, over it. */
static HlStatus
find_crossing (const HlFluid *fluid, const double *x, const HlState *in, HlSaturation *sat, HlState *ideal)
{
  HlFluidLimits limits;
  hl_fluid_limits (fluid, &limits);
  double low = x[P_OUT], high = fmin (x[P_IN], log (0.9999 * limits.p_critical)), at = 0.5 * (low + high);
  for (int round = 0; round < 80; round++)
    {
      HlStatus status;
      double p = exp (at);
      if ((status = hl_fluid_saturation_p (fluid, p, sat)) != HL_OK || (status = hl_fluid_state_ps (fluid, p, in->s, ideal)) != HL_OK)
        return status;
      double over = x[H_IN] - x[EFFICIENCY] * (x[H_IN] - ideal->h) - sat->h_vapour;
      double slope = p * (x[EFFICIENCY] * ideal->v - sat->h_vapour_p);
      if (over > 0.0)
        high = at;
      else
        low = at;
      double next = at - over / slope;
      if (!(next > low && next < high))
        next = 0.5 * (low + high);
      if (fabs (next - at) < 1e-12)
        return HL_OK;
      at = next;
    }
  return HL_NOT_CONVERGED;
}

static HlStatus
start_at_crossing (const HlFluid *fluid, const double *x, const HlState *in, WetStart *start)
{
  HlSaturation sat;
  HlState ideal;
  HlStatus status = find_crossing (fluid, x, in, &sat, &ideal);
  if (status != HL_OK)
    return status;
  double slope = sat.p * (x[EFFICIENCY] * ideal.v - sat.h_vapour_p), p_in = exp (x[P_IN]), to[N] = { 0.0 };
  to[P_IN] = -x[EFFICIENCY] * ideal.T * in->s_p * p_in / slope;
  to[H_IN] = -(1.0 - x[EFFICIENCY] * (1.0 - ideal.T * in->s_h)) / slope;
  to[EFFICIENCY] = (x[H_IN] - ideal.h) / slope;
  start->h = (Dual) { .v = sat.h_vapour };
  start->s = (Dual) { .v = sat.s_vapour };
  start->y = (Dual) { .v = 0.0 };
  for (int k = 0; k < N; k++)
    {
      start->h.d[k] = sat.h_vapour_p * sat.p * to[k];
      start->s.d[k] = sat.s_vapour_p * sat.p * to[k];
    }
  return HL_OK;
}

static void
start_at_inlet (const double *x, const HlState *in, const HlSaturation *sat, WetStart *start)
{
  start->h = (Dual) { .v = x[H_IN], .d[H_IN] = 1.0 };
  start->s = (Dual) { .v = in->s, .d[P_IN] = in->s_p * in->p, .d[H_IN] = in->s_h };
  start->y = (Dual) { .v = 0.0 };
  start->y.v = moisture_slopes (sat, x[H_IN], &start->y.d[P_IN], &start->y.d[H_IN]);
}

/* The plain definition of the isentropic efficiency, as if all were dry. */
static void
dry (const double *x, const HlState *in, const HlState *ideal, double *r, double *dr)
{
  *r = x[H_OUT] - x[H_IN] + x[EFFICIENCY] * (x[H_IN] - ideal->h);
  dr[P_IN] = -x[EFFICIENCY] * ideal->T * in->s_p * in->p;
  dr[H_IN] = -1.0 + x[EFFICIENCY] * (1.0 - ideal->T * in->s_h);
  dr[P_OUT] = -x[EFFICIENCY] * ideal->v * ideal->p;
  dr[EFFICIENCY] = x[H_IN] - ideal->h;
  dr[FACTOR] = 0.0;
  dr[H_OUT] = 1.0;
}

/* What moisture takes from the wet part: efficiency x factor x mean moisture x its drop at constant entropy. */
static HlStatus
take_moisture_loss (const HlFluid *fluid, const double *x, const WetStart *start, const HlSaturation *sat_out, double *r, double *dr)
{
  HlState ideal;
  double p_out = exp (x[P_OUT]);
  HlStatus status = hl_fluid_state_ps (fluid, p_out, start->s.v, &ideal);
  if (status != HL_OK)
    return status;
  Dual y_out = { .v = 0.0 };
  if (x[H_OUT] < sat_out->h_vapour)
    y_out.v = moisture_slopes (sat_out, x[H_OUT], &y_out.d[P_OUT], &y_out.d[H_OUT]);
  double mean = 0.5 * (start->y.v + y_out.v), drop = start->h.v - ideal.h, loss = x[EFFICIENCY] * x[FACTOR] * mean;
  *r -= loss * drop;
  for (int k = 0; k < N; k++)
    {
      double d_drop = start->h.d[k] - ideal.T * start->s.d[k] - (k == P_OUT ? ideal.v * p_out : 0.0);
      double d_loss = 0.5 * x[EFFICIENCY] * x[FACTOR] * (start->y.d[k] + y_out.d[k]);
      if (k == EFFICIENCY)
        d_loss += x[FACTOR] * mean;
      if (k == FACTOR)
        d_loss += x[EFFICIENCY] * mean;
      dr[k] -= loss * d_drop + d_loss * drop;
    }
  return HL_OK;
}

static HlStatus
wet_expansion (const HlEquation *e, G_GNUC_UNUSED const double *a, const double *x, double *r, double *dr)
{
  HlState in, ideal;
  HlSaturation sat_in, sat_out;
  HlStatus status;
  WetStart start;
  double p_in = exp (x[P_IN]), p_out = exp (x[P_OUT]);
  if ((status = hl_fluid_state_ph (e->fluid, p_in, x[H_IN], &in)) != HL_OK || (status = hl_fluid_state_ps (e->fluid, p_out, in.s, &ideal)) != HL_OK)
    return status;
  dry (x, &in, &ideal, r, dr);
  gboolean ends_dry = hl_fluid_saturation_p (e->fluid, p_out, &sat_out) != HL_OK;
  gboolean starts_wet = hl_fluid_saturation_p (e->fluid, p_in, &sat_in) == HL_OK && x[H_IN] < sat_in.h_vapour;
  if (ends_dry || (!starts_wet && x[H_IN] - x[EFFICIENCY] * (x[H_IN] - ideal.h) >= sat_out.h_vapour))
    return HL_OK;
  if (starts_wet)
    start_at_inlet (x, &in, &sat_in, &start);
  else if ((status = start_at_crossing (e->fluid, x, &in, &start)) != HL_OK)
    return status;
  return take_moisture_loss (e->fluid, x, &start, &sat_out, r, dr);
}

HlEquation *
hl_add_wet_expansion (HlSystem *system, const HlFluid *fluid, int p_in, int h_in, int p_out, int efficiency, int factor, int h_out)
{
  const int vars[N] = { p_in, h_in, p_out, efficiency, factor, h_out };
  HlEquation *e = hl_system_add_equation (system, wet_expansion, HL_VAR_ENTHALPY, 1u << FACTOR, vars, N, NULL, 0);
  e->fluid = fluid;
  e->source = N_("Baumann 1921");
  e->says = N_("{5} = {1} − {3} × ({1} − h({2}, s({0}, {1}))) + {3} × {4} × mean moisture × isentropic drop of the wet part");
  return e;
}
