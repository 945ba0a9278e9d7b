/* The zones of a closed feedwater heater: desuperheating, condensing, subcooling.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "engine/heater-zones.h"
#include "plant/i18n.h"
#include <math.h>

#define N HL_N_ZONE_INPUTS

/* A number with its derivatives to the inputs. */
typedef struct { double v, d[N]; } Dual;

static Dual
dual (double v)
{
  Dual r = { .v = v };
  return r;
}

static Dual
dual_input (const double *inputs, int k)
{
  Dual r = { .v = inputs[k] };
  r.d[k] = 1.0;
  return r;
}

static Dual
dual_sum (Dual a, double factor, Dual b)
{
  a.v += factor * b.v;
  for (int k = 0; k < N; k++)
    a.d[k] += factor * b.d[k];
  return a;
}

static Dual
dual_times (Dual a, Dual b)
{
  Dual r;
  r.v = a.v * b.v;
  for (int k = 0; k < N; k++)
    r.d[k] = a.d[k] * b.v + a.v * b.d[k];
  return r;
}

static Dual
dual_over (Dual a, Dual b)
{
  Dual r;
  r.v = a.v / b.v;
  for (int k = 0; k < N; k++)
    r.d[k] = (a.d[k] - r.v * b.d[k]) / b.v;
  return r;
}

static Dual
dual_positive (Dual a)
{
  return a.v > 0.0 ? a : dual (0.0);
}

static Dual
dual_log_mean (Dual a, Dual b)
{
  double to_a, to_b;
  Dual r;
  r.v = hl_log_mean (a.v, b.v, &to_a, &to_b);
  for (int k = 0; k < N; k++)
    r.d[k] = to_a * a.d[k] + to_b * b.d[k];
  return r;
}

static HlStatus
dual_temperature (const HlFluid *fluid, Dual ln_p, Dual h, Dual *T)
{
  HlState st;
  double p = exp (ln_p.v);
  HlStatus status = hl_fluid_state_ph (fluid, p, h.v, &st);
  if (status != HL_OK)
    return status;
  T->v = st.T;
  for (int k = 0; k < N; k++)
    T->d[k] = st.T_p * p * ln_p.d[k] + st.T_h * h.d[k];
  return HL_OK;
}

typedef struct {
  Dual heat[HL_N_ZONES], hot_in[HL_N_ZONES], hot_out[HL_N_ZONES], feed_in[HL_N_ZONES], feed_out[HL_N_ZONES], conductance[HL_N_ZONES];
} DualZones;

/* A fixed set of three slots; one without heat has no conductance, and its two borders fall together. */
static HlStatus
split (const HlFluid *shell, const HlFluid *feed, const double *x, DualZones *z)
{
  HlSaturation sat;
  HlStatus status;
  Dual p = dual_input (x, HL_ZONES_P), h_steam = dual_input (x, HL_ZONES_H_STEAM), h_drain = dual_input (x, HL_ZONES_H_DRAIN);
  Dual m_feed = dual_input (x, HL_ZONES_M_FEED), h_in = dual_input (x, HL_ZONES_H_IN), h_out = dual_input (x, HL_ZONES_H_OUT);
  Dual p_in = dual_input (x, HL_ZONES_P_IN), p_out = dual_input (x, HL_ZONES_P_OUT);
  double pressure = exp (p.v);
  if ((status = hl_fluid_saturation_p (shell, pressure, &sat)) != HL_OK)
    return status;
  Dual T_sat = dual (sat.T), h_liquid = dual (sat.h_liquid), h_vapour = dual (sat.h_vapour);
  T_sat.d[HL_ZONES_P] = sat.T_p * pressure;
  h_liquid.d[HL_ZONES_P] = sat.h_liquid_p * pressure;
  h_vapour.d[HL_ZONES_P] = sat.h_vapour_p * pressure;

  Dual all = dual_times (m_feed, dual_sum (h_out, -1.0, h_in));
  Dual superheat = dual_times (dual_input (x, HL_ZONES_M_STEAM), dual_positive (dual_sum (h_steam, -1.0, h_vapour)));
  Dual subcooling = dual_times (dual_input (x, HL_ZONES_M_DRAIN), dual_positive (dual_sum (h_liquid, -1.0, h_drain)));
  z->heat[HL_ZONE_DESUPERHEATING] = superheat;
  z->heat[HL_ZONE_SUBCOOLING] = subcooling;
  z->heat[HL_ZONE_CONDENSING] = dual_sum (dual_sum (all, -1.0, superheat), -1.0, subcooling);

  Dual T_in, T_1, T_2, T_out, T_steam = T_sat, T_drain = T_sat;
  if ((status = dual_temperature (feed, p_in, h_in, &T_in)) != HL_OK
      || (status = dual_temperature (feed, p_in, dual_sum (h_in, 1.0, dual_over (subcooling, m_feed)), &T_1)) != HL_OK
      || (status = dual_temperature (feed, p_out, dual_sum (h_out, -1.0, dual_over (superheat, m_feed)), &T_2)) != HL_OK
      || (status = dual_temperature (feed, p_out, h_out, &T_out)) != HL_OK)
    return status;
  if (superheat.v > 0.0 && (status = dual_temperature (shell, p, h_steam, &T_steam)) != HL_OK)
    return status;
  if (subcooling.v > 0.0 && (status = dual_temperature (shell, p, h_drain, &T_drain)) != HL_OK)
    return status;
  z->hot_in[HL_ZONE_DESUPERHEATING] = T_steam;
  z->hot_out[HL_ZONE_DESUPERHEATING] = z->hot_in[HL_ZONE_CONDENSING] = z->hot_out[HL_ZONE_CONDENSING] = z->hot_in[HL_ZONE_SUBCOOLING] = T_sat;
  z->hot_out[HL_ZONE_SUBCOOLING] = T_drain;
  z->feed_in[HL_ZONE_SUBCOOLING] = T_in;
  z->feed_out[HL_ZONE_SUBCOOLING] = z->feed_in[HL_ZONE_CONDENSING] = T_1;
  z->feed_out[HL_ZONE_CONDENSING] = z->feed_in[HL_ZONE_DESUPERHEATING] = T_2;
  z->feed_out[HL_ZONE_DESUPERHEATING] = T_out;
  for (int k = 0; k < HL_N_ZONES; k++)
    {
      z->conductance[k] = dual (0.0);
      if (fabs (z->heat[k].v) > 0.0)
        z->conductance[k] = dual_over (z->heat[k], dual_log_mean (dual_sum (z->hot_in[k], -1.0, z->feed_out[k]),
                                                                  dual_sum (z->hot_out[k], -1.0, z->feed_in[k])));
    }
  return HL_OK;
}

HlStatus
hl_heater_zones (const HlFluid *shell, const HlFluid *feed, const double inputs[HL_N_ZONE_INPUTS], HlHeaterZones *zones)
{
  DualZones z;
  HlStatus status = split (shell, feed, inputs, &z);
  if (status != HL_OK)
    return status;
  for (int k = 0; k < HL_N_ZONES; k++)
    {
      zones->heat[k] = z.heat[k].v;
      zones->hot_in[k] = z.hot_in[k].v;
      zones->hot_out[k] = z.hot_out[k].v;
      zones->feed_in[k] = z.feed_in[k].v;
      zones->feed_out[k] = z.feed_out[k].v;
      zones->conductance[k] = z.conductance[k].v;
    }
  return HL_OK;
}

static HlStatus
heater_conductance (const HlEquation *e, G_GNUC_UNUSED const double *a, const double *x, double *r, double *dr)
{
  DualZones z;
  HlStatus status = split (e->fluid, e->other_fluid, x, &z);
  if (status != HL_OK)
    return status;
  Dual sum = dual (0.0);
  for (int k = 0; k < HL_N_ZONES; k++)
    sum = dual_sum (sum, 1.0, z.conductance[k]);
  *r = x[N] - sum.v;
  dr[N] = 1.0;
  for (int k = 0; k < N; k++)
    dr[k] = -sum.d[k];
  return HL_OK;
}

HlEquation *
hl_add_heater_conductance (HlSystem *system, const HlFluid *shell, const HlFluid *feed, const int inputs[HL_N_ZONE_INPUTS], int conductance)
{
  int vars[N + 1];
  for (int k = 0; k < N; k++)
    vars[k] = inputs[k];
  vars[N] = conductance;
  HlEquation *e = hl_system_add_equation (system, heater_conductance, HL_VAR_CONDUCTANCE, 1u << N, vars, N + 1, NULL, 0);
  e->fluid = shell;
  e->other_fluid = feed;
  e->output = N;
  e->source = N_("counterflow, zone by zone; ΔT_m of each by its end differences");
  e->says = N_("{10} = sum over desuperheating, condensing and subcooling of heat ÷ logarithmic mean difference");
  return e;
}
