/* Temperatures of two streams in counterflow over the heat that passes between them.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "engine/exchanger-curve.h"
#include "plant/i18n.h"
#include <math.h>

#define N HL_N_CURVE_INPUTS

/* A number with its derivatives to the inputs. */
typedef struct { double v, d[N]; } Dual;

/* One stream from its colder end to its hotter one, pressure (as logarithm) and enthalpy in proportion to the heat. */
typedef struct {
  const HlFluid *fluid;
  const double  *x;
  int            p0, h0, p1, h1;        /* inputs at the colder and at the hotter end */
} Side;

typedef struct {
  Dual share, hot, cold;
} Point;

typedef struct {
  int   n;
  Point points[HL_CURVE_MOST];
} Curve;

/* Value at a share of the way between two inputs. */
static Dual
between (const double *x, int from, int to, const Dual *share)
{
  Dual r = { .v = x[from] + share->v * (x[to] - x[from]) };
  for (int k = 0; k < N; k++)
    r.d[k] = share->d[k] * (x[to] - x[from]);
  r.d[from] += 1.0 - share->v;
  r.d[to] += share->v;
  return r;
}

static HlStatus
temperature (const Side *side, const Dual *share, Dual *T)
{
  Dual ln_p = between (side->x, side->p0, side->p1, share), h = between (side->x, side->h0, side->h1, share);
  HlState st;
  double p = exp (ln_p.v);
  HlStatus status = hl_fluid_state_ph (side->fluid, p, h.v, &st);
  if (status != HL_OK)
    return status;
  T->v = st.T;
  for (int k = 0; k < N; k++)
    T->d[k] = st.T_p * p * ln_p.d[k] + st.T_h * h.d[k];
  return HL_OK;
}

/* Where the side's line meets the saturated liquid or vapour: share and, by the saturation line alone, temperature.  One more
 * Newton step with derivatives gives those of the share. */
static gboolean
find_kink (const Side *side, gboolean is_vapour, Dual *share, Dual *T)
{
  const double *x = side->x;
  double rise = x[side->h1] - x[side->h0], ln_rise = x[side->p1] - x[side->p0], f = 0.5;
  HlSaturation sat;
  if (!(fabs (rise) > 1.0))
    return FALSE;
  for (int round = 0; round < 20; round++)
    {
      double p = exp (x[side->p0] + f * ln_rise);
      if (hl_fluid_saturation_p (side->fluid, p, &sat) != HL_OK)
        return FALSE;
      double at = is_vapour ? sat.h_vapour : sat.h_liquid, at_p = is_vapour ? sat.h_vapour_p : sat.h_liquid_p;
      double slope = rise - at_p * p * ln_rise, step = (x[side->h0] + f * rise - at) / slope;
      f -= step;
      if (!(f > -10.0 && f < 10.0))
        return FALSE;
      if (fabs (step) > 1e-13)
        continue;
      if (!(f > 0.0 && f < 1.0))
        return FALSE;
      *share = (Dual) { .v = f };
      Dual h = between (x, side->h0, side->h1, share), ln_p = between (x, side->p0, side->p1, share);
      for (int k = 0; k < N; k++)
        share->d[k] = -(h.d[k] - at_p * p * ln_p.d[k]) / slope;
      ln_p = between (x, side->p0, side->p1, share);
      T->v = sat.T;
      for (int k = 0; k < N; k++)
        T->d[k] = sat.T_p * p * ln_p.d[k];
      return TRUE;
    }
  return FALSE;
}

static void
insert (Curve *curve, const Point *point)
{
  int at = curve->n++;
  for (; at > 0 && curve->points[at - 1].share.v > point->share.v; at--)
    curve->points[at] = curve->points[at - 1];
  curve->points[at] = *point;
}

static HlStatus
sample (const HlFluid *hot_fluid, const HlFluid *cold_fluid, const double *x, Curve *curve)
{
  const Side hot = { hot_fluid, x, HL_CURVE_P_HOT_OUT, HL_CURVE_H_HOT_OUT, HL_CURVE_P_HOT_IN, HL_CURVE_H_HOT_IN };
  const Side cold = { cold_fluid, x, HL_CURVE_P_COLD_IN, HL_CURVE_H_COLD_IN, HL_CURVE_P_COLD_OUT, HL_CURVE_H_COLD_OUT };
  HlStatus status;
  curve->n = 0;
  for (int k = 0; k <= HL_CURVE_PARTS; k++)
    {
      Point *point = &curve->points[curve->n++];
      point->share = (Dual) { .v = (double) k / HL_CURVE_PARTS };
      if ((status = temperature (&hot, &point->share, &point->hot)) != HL_OK
          || (status = temperature (&cold, &point->share, &point->cold)) != HL_OK)
        return status;
    }
  for (int k = 0; k < 4; k++)
    {
      Point point;
      gboolean is_hot = k < 2;
      if (!find_kink (is_hot ? &hot : &cold, k % 2 == 1, &point.share, is_hot ? &point.hot : &point.cold))
        continue;
      status = temperature (is_hot ? &cold : &hot, &point.share, is_hot ? &point.cold : &point.hot);
      if (status != HL_OK)
        return status;
      insert (curve, &point);
    }
  return HL_OK;
}

HlStatus
hl_exchanger_curve (const HlFluid *hot, const HlFluid *cold, const double inputs[HL_N_CURVE_INPUTS], HlExchangerCurve *curve)
{
  Curve c;
  HlStatus status = sample (hot, cold, inputs, &c);
  if (status != HL_OK)
    return status;
  curve->n = c.n;
  for (int k = 0; k < c.n; k++)
    {
      curve->share[k] = c.points[k].share.v;
      curve->hot[k] = c.points[k].hot.v;
      curve->cold[k] = c.points[k].cold.v;
    }
  return HL_OK;
}

/* --- equations --------------------------------------------------------------- */

static HlStatus
pinch (const HlEquation *e, G_GNUC_UNUSED const double *a, const double *x, double *r, double *dr)
{
  Curve c;
  HlStatus status = sample (e->fluid, e->other_fluid, x, &c);
  if (status != HL_OK)
    return status;
  int least = 0;
  for (int k = 1; k < c.n; k++)
    if (c.points[k].hot.v - c.points[k].cold.v < c.points[least].hot.v - c.points[least].cold.v)
      least = k;
  const Point *at = &c.points[least];
  *r = x[N] - (at->hot.v - at->cold.v);
  for (int k = 0; k < N; k++)
    dr[k] = at->cold.d[k] - at->hot.d[k];
  dr[N] = 1.0;
  return HL_OK;
}

static HlEquation *
with_fluids (HlEquation *e, const HlFluid *hot, const HlFluid *cold, const char *says, int output)
{
  e->fluid = hot;
  e->other_fluid = cold;
  e->source = N_("counterflow, part by part along the heat");
  e->says = says;
  e->output = output;
  return e;
}

HlEquation *
hl_add_exchanger_pinch (HlSystem *system, const HlFluid *hot, const HlFluid *cold, const int inputs[HL_N_CURVE_INPUTS], int difference)
{
  int vars[N + 1];
  for (int k = 0; k < N; k++)
    vars[k] = inputs[k];
  vars[N] = difference;
  HlEquation *e = hl_system_add_equation (system, pinch, HL_VAR_TEMPERATURE_DIFFERENCE, 1u << N, vars, N + 1, NULL, 0);
  return with_fluids (e, hot, cold, N_("{8} = least difference between the hot side, ({0}, {1}) to ({2}, {3}), and the cold side, ({4}, {5}) to ({6}, {7}), in counterflow"), N);
}

/* conductance = heat x sum of share / logarithmic mean. */
static HlStatus
conductance (const HlEquation *e, G_GNUC_UNUSED const double *a, const double *x, double *r, double *dr)
{
  Curve c;
  HlStatus status = sample (e->fluid, e->other_fluid, x, &c);
  if (status != HL_OK)
    return status;
  double sum = 0.0, to[N] = { 0.0 };
  for (int i = 0; i + 1 < c.n; i++)
    {
      const Point *from = &c.points[i], *on = &c.points[i + 1];
      double to_d1, to_d2, share = on->share.v - from->share.v;
      double mean = hl_log_mean (from->hot.v - from->cold.v, on->hot.v - on->cold.v, &to_d1, &to_d2);
      sum += share / mean;
      for (int k = 0; k < N; k++)
        {
          double d_mean = to_d1 * (from->hot.d[k] - from->cold.d[k]) + to_d2 * (on->hot.d[k] - on->cold.d[k]);
          to[k] += (on->share.d[k] - from->share.d[k] - share / mean * d_mean) / mean;
        }
    }
  *r = x[N + 1] - x[N] * sum;
  for (int k = 0; k < N; k++)
    dr[k] = -x[N] * to[k];
  dr[N] = -sum;
  dr[N + 1] = 1.0;
  return HL_OK;
}

HlEquation *
hl_add_exchanger_conductance (HlSystem *system, const HlFluid *hot, const HlFluid *cold, const int inputs[HL_N_CURVE_INPUTS],
                              int heat, int ua)
{
  int vars[N + 2];
  for (int k = 0; k < N; k++)
    vars[k] = inputs[k];
  vars[N] = heat;
  vars[N + 1] = ua;
  HlEquation *e = hl_system_add_equation (system, conductance, HL_VAR_CONDUCTANCE, 3u << N, vars, N + 2, NULL, 0);
  return with_fluids (e, hot, cold, N_("{9} = sum over parts of {8} of heat ÷ logarithmic mean difference"), N + 1);
}

/* Variables of the effectiveness. */
enum { M_HOT, P_HOT_IN, H_HOT_IN, P_HOT_OUT, M_COLD, P_COLD_IN, H_COLD_IN, P_COLD_OUT, HEAT, SHARE, N_SHARE };

/* Enthalpy that a side would reach at the temperature of the other's inlet: to its own outlet pressure and the other's state. */
static HlStatus
farthest (const HlFluid *fluid, double p, const HlState *other, double *h, double *to_ln_p, double *to_other_ln_p, double *to_other_h)
{
  HlState st;
  HlStatus status = hl_fluid_state_pT (fluid, p, other->T, &st);
  if (status != HL_OK)
    return status;
  *h = st.h;
  *to_ln_p = -st.T_p / st.T_h * p;
  *to_other_ln_p = other->T_p * other->p / st.T_h;
  *to_other_h = other->T_h / st.T_h;
  return HL_OK;
}

static HlStatus
effectiveness (const HlEquation *e, G_GNUC_UNUSED const double *a, const double *x, double *r, double *dr)
{
  HlState hot, cold;
  HlStatus status;
  double h_hot, hot_p, hot_cp, hot_ch, h_cold, cold_p, cold_hp, cold_hh;
  if ((status = hl_fluid_state_ph (e->fluid, exp (x[P_HOT_IN]), x[H_HOT_IN], &hot)) != HL_OK
      || (status = hl_fluid_state_ph (e->other_fluid, exp (x[P_COLD_IN]), x[H_COLD_IN], &cold)) != HL_OK
      || (status = farthest (e->fluid, exp (x[P_HOT_OUT]), &cold, &h_hot, &hot_p, &hot_cp, &hot_ch)) != HL_OK
      || (status = farthest (e->other_fluid, exp (x[P_COLD_OUT]), &hot, &h_cold, &cold_p, &cold_hp, &cold_hh)) != HL_OK)
    return status;
  double from_hot = x[M_HOT] * (x[H_HOT_IN] - h_hot), to_cold = x[M_COLD] * (h_cold - x[H_COLD_IN]);
  for (int k = 0; k < N_SHARE; k++)
    dr[k] = 0.0;
  if (from_hot <= to_cold)
    {
      dr[M_HOT] = x[H_HOT_IN] - h_hot;
      dr[H_HOT_IN] = x[M_HOT];
      dr[P_HOT_OUT] = -x[M_HOT] * hot_p;
      dr[P_COLD_IN] = -x[M_HOT] * hot_cp;
      dr[H_COLD_IN] = -x[M_HOT] * hot_ch;
    }
  else
    {
      dr[M_COLD] = h_cold - x[H_COLD_IN];
      dr[H_COLD_IN] = -x[M_COLD];
      dr[P_COLD_OUT] = x[M_COLD] * cold_p;
      dr[P_HOT_IN] = x[M_COLD] * cold_hp;
      dr[H_HOT_IN] = x[M_COLD] * cold_hh;
    }
  double most = fmin (from_hot, to_cold);
  for (int k = 0; k < HEAT; k++)
    dr[k] *= x[SHARE];
  *r = x[SHARE] * most - x[HEAT];
  dr[HEAT] = -1.0;
  dr[SHARE] = most;
  return HL_OK;
}

HlEquation *
hl_add_exchanger_effectiveness (HlSystem *system, const HlFluid *hot, const HlFluid *cold, const int inputs[HL_N_CURVE_INPUTS],
                                int m_hot, int m_cold, int heat, int share)
{
  const int vars[N_SHARE] = { m_hot, inputs[HL_CURVE_P_HOT_IN], inputs[HL_CURVE_H_HOT_IN], inputs[HL_CURVE_P_HOT_OUT],
                              m_cold, inputs[HL_CURVE_P_COLD_IN], inputs[HL_CURVE_H_COLD_IN], inputs[HL_CURVE_P_COLD_OUT], heat, share };
  HlEquation *e = hl_system_add_equation (system, effectiveness, HL_VAR_POWER, 3u << HEAT, vars, N_SHARE, NULL, 0);
  return with_fluids (e, hot, cold, N_("{9} = {8} ÷ least of {0} × ({2} − h({3}, T of the cold inlet)) and {4} × (h({7}, T of the hot inlet) − {6})"), SHARE);
}
