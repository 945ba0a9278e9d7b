/* The forms of equations that components are made of, each with exact derivatives.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "engine/equations.h"
#include "plant/i18n.h"
#include <math.h>

#define ADD(f, kind, linear, ...) \
  hl_system_add_equation (system, f, kind, linear, (const int[]) { __VA_ARGS__ }, (int) G_N_ELEMENTS (((const int[]) { __VA_ARGS__ })), NULL, 0)

static HlEquation *
with (HlEquation *equation, const HlFluid *fluid, const char *says, int output)
{
  equation->fluid = fluid;
  equation->says = says;
  equation->output = output;
  return equation;
}

/* --- linear and bilinear ------------------------------------------------ */

static HlStatus
linear (const HlEquation *e, const double *a, const double *x, double *r, double *dr)
{
  double sum = -a[e->n];
  for (int k = 0; k < e->n; k++)
    {
      sum += a[k] * x[k];
      dr[k] = a[k];
    }
  *r = sum;
  return HL_OK;
}

HlEquation *
hl_add_linear (HlSystem *system, HlVarKind kind, const int *vars, const double *factors, int n, double constant)
{
  double a[HL_EQUATION_MOST + 1];
  g_assert (n <= HL_EQUATION_MOST);
  for (int k = 0; k < n; k++)
    a[k] = factors[k];
  a[n] = constant;
  return hl_system_add_equation (system, linear, kind, HL_ALL_LINEAR, vars, n, a, n + 1);
}

HlEquation *
hl_add_equal (HlSystem *system, int a, int b)
{
  return hl_add_linear (system, hl_system_var (system, a)->kind, (const int[]) { a, b }, (const double[]) { 1.0, -1.0 }, 2, 0.0);
}

static HlStatus
energy (const HlEquation *e, const double *a, const double *x, double *r, double *dr)
{
  int n_pairs = (int) a[0];
  const double *signs = a + 1, *factors = a + 1 + n_pairs;
  double sum = 0.0;
  for (int k = 0; k < n_pairs; k++)
    {
      sum += signs[k] * x[2 * k] * x[2 * k + 1];
      dr[2 * k] = signs[k] * x[2 * k + 1];
      dr[2 * k + 1] = signs[k] * x[2 * k];
    }
  for (int k = 2 * n_pairs; k < e->n; k++)
    {
      sum += factors[k - 2 * n_pairs] * x[k];
      dr[k] = factors[k - 2 * n_pairs];
    }
  *r = sum;
  return HL_OK;
}

HlEquation *
hl_add_energy (HlSystem *system, HlVarKind kind, const int *pairs, const double *signs, int n_pairs,
               const int *rest, const double *factors, int n_rest)
{
  int vars[HL_EQUATION_MOST], n = 0, n_constants = 0;
  double a[HL_EQUATION_MOST + 1];
  g_assert (2 * n_pairs + n_rest <= HL_EQUATION_MOST);
  a[n_constants++] = n_pairs;
  for (int k = 0; k < n_pairs; k++)
    {
      vars[n++] = pairs[2 * k];
      vars[n++] = pairs[2 * k + 1];
      a[n_constants++] = signs[k];
    }
  for (int k = 0; k < n_rest; k++)
    {
      vars[n++] = rest[k];
      a[n_constants++] = factors[k];
    }
  return hl_system_add_equation (system, energy, kind, HL_ALL_LINEAR, vars, n, a, n_constants);
}

HlEquation *
hl_add_product (HlSystem *system, int a, int b, int product)
{
  HlEquation *e = hl_add_energy (system, hl_system_var (system, product)->kind, (const int[]) { a, b }, (const double[]) { 1.0 }, 1,
                                 &product, (const double[]) { -1.0 }, 1);
  return with (e, NULL, N_("{2} = {0} × {1}"), 2);
}

HlEquation *
hl_add_quotient (HlSystem *system, int quotient, int top, int bottom)
{
  HlEquation *e = hl_add_energy (system, hl_system_var (system, top)->kind, (const int[]) { quotient, bottom }, (const double[]) { 1.0 }, 1,
                                 &top, (const double[]) { -1.0 }, 1);
  return with (e, NULL, N_("{0} = {2} ÷ {1}"), 0);
}

gboolean hl_equation_is_energy (const HlEquation *e) { return e->residual == energy; }
gboolean hl_equation_is_linear (const HlEquation *e) { return e->residual == linear; }

/* --- pressures ---------------------------------------------------------- */

static HlStatus
pressure_loss (G_GNUC_UNUSED const HlEquation *e, G_GNUC_UNUSED const double *a, const double *x, double *r, double *dr)
{
  double left = 1.0 - x[2];
  if (!(left > 0.0))
    return HL_OUTSIDE_RANGE;
  *r = x[1] - x[0] - log (left);
  dr[0] = -1.0;
  dr[1] = 1.0;
  dr[2] = 1.0 / left;
  return HL_OK;
}

HlEquation *
hl_add_pressure_loss (HlSystem *system, int p_in, int p_out, int loss)
{
  return with (ADD (pressure_loss, HL_VAR_PRESSURE, 3, p_in, p_out, loss), NULL, N_("{1} = {0} × (1 − {2})"), -1);
}

static HlStatus
pressure_rise (G_GNUC_UNUSED const HlEquation *e, G_GNUC_UNUSED const double *a, const double *x, double *r, double *dr)
{
  dr[0] = exp (x[0]);
  dr[1] = -exp (x[1]);
  dr[2] = 1.0;
  *r = x[2] + dr[1] + dr[0];
  return HL_OK;
}

HlEquation *
hl_add_pressure_rise (HlSystem *system, int p_in, int p_out, int rise)
{
  return with (ADD (pressure_rise, HL_VAR_PRESSURE_DIFFERENCE, 4, p_in, p_out, rise), NULL, N_("{2} = {1} − {0}"), 2);
}

/* --- machines ------------------------------------------------------------ */

/* Enthalpy at p_out and the entropy of (p_in, h_in), with derivatives to ln p_in, h_in and ln p_out:
 * along a line of constant entropy dh = v dp, at constant pressure dh = T ds. */
static HlStatus
isentropic_end (const HlFluid *fluid, double ln_p_in, double h_in, double ln_p_out,
                double *h_end, double *to_p_in, double *to_h_in, double *to_p_out)
{
  HlState in, end;
  HlStatus status;
  double p_in = exp (ln_p_in), p_out = exp (ln_p_out);
  if ((status = hl_fluid_state_ph (fluid, p_in, h_in, &in)) != HL_OK)
    return status;
  if ((status = hl_fluid_state_ps (fluid, p_out, in.s, &end)) != HL_OK)
    return status;
  *h_end = end.h;
  *to_p_in = end.T * in.s_p * p_in;
  *to_h_in = end.T * in.s_h;
  *to_p_out = end.v * p_out;
  return HL_OK;
}

static HlStatus
expansion (const HlEquation *e, G_GNUC_UNUSED const double *a, const double *x, double *r, double *dr)
{
  double h_end, to_p_in, to_h_in, to_p_out;
  HlStatus status = isentropic_end (e->fluid, x[0], x[1], x[2], &h_end, &to_p_in, &to_h_in, &to_p_out);
  if (status != HL_OK)
    return status;
  *r = x[4] - x[1] + x[3] * (x[1] - h_end);
  dr[0] = -x[3] * to_p_in;
  dr[1] = -1.0 + x[3] * (1.0 - to_h_in);
  dr[2] = -x[3] * to_p_out;
  dr[3] = x[1] - h_end;
  dr[4] = 1.0;
  return HL_OK;
}

HlEquation *
hl_add_expansion (HlSystem *system, const HlFluid *fluid, int p_in, int h_in, int p_out, int efficiency, int h_out)
{
  return with (ADD (expansion, HL_VAR_ENTHALPY, 1u << 3 | 1u << 4, p_in, h_in, p_out, efficiency, h_out), fluid,
               N_("{4} = {1} − {3} × ({1} − h({2}, s({0}, {1})))"), -1);
}

HlEquation *
hl_add_overall_efficiency (HlSystem *system, const HlFluid *fluid, int p_in, int h_in, int p_out, int efficiency, int h_out)
{
  return with (ADD (expansion, HL_VAR_ENTHALPY, 1u << 3 | 1u << 4, p_in, h_in, p_out, efficiency, h_out), fluid,
               N_("{3} = ({1} − {4}) ÷ ({1} − h({2}, s({0}, {1})))"), 3);
}

static HlStatus
compression (const HlEquation *e, G_GNUC_UNUSED const double *a, const double *x, double *r, double *dr)
{
  double h_end, to_p_in, to_h_in, to_p_out;
  HlStatus status = isentropic_end (e->fluid, x[0], x[1], x[2], &h_end, &to_p_in, &to_h_in, &to_p_out);
  if (status != HL_OK)
    return status;
  *r = x[3] * (x[4] - x[1]) - (h_end - x[1]);
  dr[0] = -to_p_in;
  dr[1] = 1.0 - x[3] - to_h_in;
  dr[2] = -to_p_out;
  dr[3] = x[4] - x[1];
  dr[4] = x[3];
  return HL_OK;
}

HlEquation *
hl_add_compression (HlSystem *system, const HlFluid *fluid, int p_in, int h_in, int p_out, int efficiency, int h_out)
{
  return with (ADD (compression, HL_VAR_ENTHALPY, 1u << 3 | 1u << 4, p_in, h_in, p_out, efficiency, h_out), fluid,
               N_("{4} = {1} + (h({2}, s({0}, {1})) − {1}) ÷ {3}"), -1);
}

/* (s - s_in) (h_end - h_in) = (h - h_in) (s_end - s_in), with s from (p, h), divided by 1000 K to stay an enthalpy. */
static HlStatus
straight_line (const HlEquation *e, G_GNUC_UNUSED const double *a, const double *x, double *r, double *dr)
{
  HlState in, end, at;
  HlStatus status;
  double p_in = exp (x[0]), p_end = exp (x[2]), p = exp (x[4]);
  if ((status = hl_fluid_state_ph (e->fluid, p_in, x[1], &in)) != HL_OK
      || (status = hl_fluid_state_ph (e->fluid, p_end, x[3], &end)) != HL_OK
      || (status = hl_fluid_state_ph (e->fluid, p, x[5], &at)) != HL_OK)
    return status;
  double dh_end = x[3] - x[1], dh = x[5] - x[1], ds_end = end.s - in.s, ds = at.s - in.s, unit = 1e-3;
  *r = unit * (ds * dh_end - dh * ds_end);
  dr[0] = unit * in.s_p * p_in * (dh - dh_end);
  dr[1] = unit * (in.s_h * (dh - dh_end) - ds + ds_end);
  dr[2] = -unit * dh * end.s_p * p_end;
  dr[3] = unit * (ds - dh * end.s_h);
  dr[4] = unit * at.s_p * p * dh_end;
  dr[5] = unit * (at.s_h * dh_end - ds_end);
  return HL_OK;
}

HlEquation *
hl_add_straight_line (HlSystem *system, const HlFluid *fluid, int p_in, int h_in, int p_end, int h_end, int p, int h)
{
  return with (ADD (straight_line, HL_VAR_ENTHALPY, 0, p_in, h_in, p_end, h_end, p, h), fluid,
               N_("{5} lies at {4} on the straight line in h and s from ({0}, {1}) to ({2}, {3})"), -1);
}

/* --- states -------------------------------------------------------------- */

static HlStatus
enthalpy_at_entropy (const HlEquation *e, G_GNUC_UNUSED const double *a, const double *x, double *r, double *dr)
{
  HlState st;
  double p = exp (x[0]);
  HlStatus status = hl_fluid_state_ps (e->fluid, p, x[1], &st);
  if (status != HL_OK)
    return status;
  *r = x[2] - st.h;
  dr[0] = -st.v * p;
  dr[1] = -st.T;
  dr[2] = 1.0;
  return HL_OK;
}

HlEquation *
hl_add_enthalpy_at_entropy (HlSystem *system, const HlFluid *fluid, int p, int s, int h)
{
  return with (ADD (enthalpy_at_entropy, HL_VAR_ENTHALPY, 4, p, s, h), fluid, N_("{2} = h({0}, {1})"), -1);
}

static HlStatus
entropy (const HlEquation *e, G_GNUC_UNUSED const double *a, const double *x, double *r, double *dr)
{
  HlState st;
  double p = exp (x[0]);
  HlStatus status = hl_fluid_state_ph (e->fluid, p, x[1], &st);
  if (status != HL_OK)
    return status;
  *r = x[2] - st.s;
  dr[0] = -st.s_p * p;
  dr[1] = -st.s_h;
  dr[2] = 1.0;
  return HL_OK;
}

HlEquation *
hl_add_entropy (HlSystem *system, const HlFluid *fluid, int p, int h, int s)
{
  return with (ADD (entropy, HL_VAR_ENTROPY, 4, p, h, s), fluid, N_("{2} = s({0}, {1})"), 2);
}

/* r = h - (h' + x (h'' - h')), with @x the quality and @to_x the sign of dx. */
static HlStatus
wet_enthalpy (const HlFluid *fluid, double ln_p, double quality, double sign, double h, double *r, double *dr)
{
  HlSaturation sat;
  double p = exp (ln_p);
  HlStatus status = hl_fluid_saturation_p (fluid, p, &sat);
  if (status != HL_OK)
    return status;
  double span = sat.h_vapour - sat.h_liquid;
  *r = h - (sat.h_liquid + quality * span);
  dr[0] = -(sat.h_liquid_p + quality * (sat.h_vapour_p - sat.h_liquid_p)) * p;
  dr[1] = -sign * span;
  dr[2] = 1.0;
  return HL_OK;
}

static HlStatus
enthalpy_at_quality (const HlEquation *e, G_GNUC_UNUSED const double *a, const double *x, double *r, double *dr)
{
  return wet_enthalpy (e->fluid, x[0], x[1], 1.0, x[2], r, dr);
}

HlEquation *
hl_add_enthalpy_at_quality (HlSystem *system, const HlFluid *fluid, int p, int x, int h)
{
  return with (ADD (enthalpy_at_quality, HL_VAR_ENTHALPY, 2 | 4, p, x, h), fluid, N_("{2} = h′({0}) + {1} × (h″({0}) − h′({0}))"), -1);
}

static HlStatus
enthalpy_at_moisture (const HlEquation *e, G_GNUC_UNUSED const double *a, const double *x, double *r, double *dr)
{
  return wet_enthalpy (e->fluid, x[0], 1.0 - x[1], -1.0, x[2], r, dr);
}

HlEquation *
hl_add_enthalpy_at_moisture (HlSystem *system, const HlFluid *fluid, int p, int y, int h)
{
  return with (ADD (enthalpy_at_moisture, HL_VAR_ENTHALPY, 2 | 4, p, y, h), fluid, N_("{2} = h″({0}) − {1} × (h″({0}) − h′({0}))"), -1);
}

/* x = (h - h')/(h'' - h'), also outside 0 to 1: below the saturated liquid negative, above the vapour greater than one. */
static HlStatus
quality (const HlEquation *e, G_GNUC_UNUSED const double *a, const double *x, double *r, double *dr)
{
  HlSaturation sat;
  double p = exp (x[0]);
  HlStatus status = hl_fluid_saturation_p (e->fluid, p, &sat);
  if (status != HL_OK)
    return status;
  double span = sat.h_vapour - sat.h_liquid, q = (x[1] - sat.h_liquid) / span;
  *r = x[2] - q;
  dr[0] = (sat.h_liquid_p + q * (sat.h_vapour_p - sat.h_liquid_p)) / span * p;
  dr[1] = -1.0 / span;
  dr[2] = 1.0;
  return HL_OK;
}

HlEquation *
hl_add_quality (HlSystem *system, const HlFluid *fluid, int p, int h, int x)
{
  return with (ADD (quality, HL_VAR_RATIO, 4, p, h, x), fluid, N_("{2} = ({1} − h′({0})) ÷ (h″({0}) − h′({0}))"), 2);
}

/* Moisture of steam; none where it is dry, and none above the critical pressure. */
static HlStatus
moisture (const HlEquation *e, G_GNUC_UNUSED const double *a, const double *x, double *r, double *dr)
{
  HlSaturation sat;
  double p = exp (x[0]);
  *r = x[2];
  dr[0] = dr[1] = 0.0;
  dr[2] = 1.0;
  if (hl_fluid_saturation_p (e->fluid, p, &sat) != HL_OK || x[1] >= sat.h_vapour)
    return HL_OK;
  double span = sat.h_vapour - sat.h_liquid, y = (sat.h_vapour - x[1]) / span;
  *r = x[2] - y;
  dr[0] = -(sat.h_vapour_p - y * (sat.h_vapour_p - sat.h_liquid_p)) / span * p;
  dr[1] = 1.0 / span;
  return HL_OK;
}

HlEquation *
hl_add_moisture (HlSystem *system, const HlFluid *fluid, int p, int h, int y)
{
  return with (ADD (moisture, HL_VAR_RATIO, 4, p, h, y), fluid, N_("{2} = (h″({0}) − {1}) ÷ (h″({0}) − h′({0})), 0 where dry"), 2);
}

static HlStatus
volume (const HlEquation *e, G_GNUC_UNUSED const double *a, const double *x, double *r, double *dr)
{
  HlState st;
  double p = exp (x[0]);
  HlStatus status = hl_fluid_state_ph (e->fluid, p, x[1], &st);
  if (status != HL_OK)
    return status;
  *r = x[2] - st.v;
  dr[0] = -st.v_p * p;
  dr[1] = -st.v_h;
  dr[2] = 1.0;
  return HL_OK;
}

HlEquation *
hl_add_volume (HlSystem *system, const HlFluid *fluid, int p, int h, int v)
{
  return with (ADD (volume, HL_VAR_VOLUME, 4, p, h, v), fluid, N_("{2} = v({0}, {1})"), 2);
}

static HlStatus
saturation (const HlEquation *e, G_GNUC_UNUSED const double *a, const double *x, double *r, double *dr)
{
  HlSaturation sat;
  double p = exp (x[0]);
  HlStatus status = hl_fluid_saturation_p (e->fluid, p, &sat);
  if (status != HL_OK)
    return status;
  *r = x[1] - sat.T;
  dr[0] = -sat.T_p * p;
  dr[1] = 1.0;
  return HL_OK;
}

HlEquation *
hl_add_saturation (HlSystem *system, const HlFluid *fluid, int p, int T)
{
  return with (ADD (saturation, HL_VAR_TEMPERATURE, 2, p, T), fluid, N_("{1} = T_sat({0})"), -1);
}

/* Liquid, @subcooling below saturation.  A drain that would be hotter than saturation (negative subcooling) continues the
 * liquid line with a plain slope, so that an iteration may pass there; what ends there is reported afterwards. */
static HlStatus
liquid (const HlEquation *e, G_GNUC_UNUSED const double *a, const double *x, double *r, double *dr)
{
  const double slope = 4.5e3;
  HlSaturation sat;
  HlState st;
  double p = exp (x[0]);
  HlStatus status = hl_fluid_saturation_p (e->fluid, p, &sat);
  if (status != HL_OK)
    return status;
  dr[2] = 1.0;
  if (x[1] <= 0.0 || hl_fluid_state_pT (e->fluid, p, sat.T - x[1], &st) != HL_OK || st.phase == HL_PHASE_VAPOUR)
    {
      *r = x[2] - sat.h_liquid + slope * x[1];
      dr[0] = -sat.h_liquid_p * p;
      dr[1] = slope;
      return HL_OK;
    }
  *r = x[2] - st.h;
  dr[0] = -p * (sat.T_p - st.T_p) / st.T_h;
  dr[1] = 1.0 / st.T_h;
  return HL_OK;
}

HlEquation *
hl_add_liquid (HlSystem *system, const HlFluid *fluid, int p, int subcooling, int h)
{
  return with (ADD (liquid, HL_VAR_ENTHALPY, 4, p, subcooling, h), fluid, N_("{2} = h({0}, T_sat({0}) − {1})"), -1);
}

/* Vapour, @superheat above saturation; below zero a plain slope, so that an iteration may pass there. */
static HlStatus
vapour (const HlEquation *e, G_GNUC_UNUSED const double *a, const double *x, double *r, double *dr)
{
  const double slope = 1.5e3;
  HlSaturation sat;
  HlState st;
  double p = exp (x[0]);
  HlStatus status = hl_fluid_saturation_p (e->fluid, p, &sat);
  if (status != HL_OK)
    return status;
  dr[2] = 1.0;
  if (x[1] <= 0.0 || hl_fluid_state_pT (e->fluid, p, sat.T + x[1], &st) != HL_OK || st.phase == HL_PHASE_LIQUID)
    {
      *r = x[2] - sat.h_vapour - slope * x[1];
      dr[0] = -sat.h_vapour_p * p;
      dr[1] = -slope;
      return HL_OK;
    }
  *r = x[2] - st.h;
  dr[0] = -p * (sat.T_p - st.T_p) / st.T_h;
  dr[1] = -1.0 / st.T_h;
  return HL_OK;
}

HlEquation *
hl_add_vapour (HlSystem *system, const HlFluid *fluid, int p, int superheat, int h)
{
  return with (ADD (vapour, HL_VAR_ENTHALPY, 4, p, superheat, h), fluid, N_("{2} = h({0}, T_sat({0}) + {1})"), -1);
}

static HlStatus
subcooled_temperature (const HlEquation *e, G_GNUC_UNUSED const double *a, const double *x, double *r, double *dr)
{
  HlSaturation sat;
  double p = exp (x[0]);
  HlStatus status = hl_fluid_saturation_p (e->fluid, p, &sat);
  if (status != HL_OK)
    return status;
  *r = x[2] - sat.T + x[1];
  dr[0] = -sat.T_p * p;
  dr[1] = 1.0;
  dr[2] = 1.0;
  return HL_OK;
}

HlEquation *
hl_add_subcooled_temperature (HlSystem *system, const HlFluid *fluid, int p, int subcooling, int T)
{
  return with (ADD (subcooled_temperature, HL_VAR_TEMPERATURE, 2 | 4, p, subcooling, T), fluid, N_("{2} = T_sat({0}) − {1}"), -1);
}

/* --- cooling water ------------------------------------------------------- */

static HlStatus
cooling_heat (const HlEquation *e, G_GNUC_UNUSED const double *a, const double *x, double *r, double *dr)
{
  HlState in, out;
  HlStatus status;
  double p = exp (x[4]);
  if ((status = hl_fluid_state_pT (e->fluid, p, x[2], &in)) != HL_OK
      || (status = hl_fluid_state_pT (e->fluid, p, x[2] + x[3], &out)) != HL_OK)
    return status;
  *r = x[1] * (out.h - in.h) - x[0];
  dr[0] = -1.0;
  dr[1] = out.h - in.h;
  dr[2] = x[1] * (1.0 / out.T_h - 1.0 / in.T_h);
  dr[3] = x[1] / out.T_h;
  dr[4] = x[1] * p * (in.T_p / in.T_h - out.T_p / out.T_h);
  return HL_OK;
}

HlEquation *
hl_add_cooling_heat (HlSystem *system, const HlFluid *fluid, int heat, int flow, int T_in, int rise, int p)
{
  return with (ADD (cooling_heat, HL_VAR_POWER, 1 | 2, heat, flow, T_in, rise, p), fluid,
               N_("{0} = {1} × (h({4}, {2} + {3}) − h({4}, {2}))"), 1);
}

/* Near equality the mean of both with the next terms of the series; where one of them is not positive, the value V at a small
 * positive floor shrunk by the depth E of the crossing, V^2/(V - E): it stays positive and falls on, so that heat over it, the
 * conductance, grows in proportion to the depth and an iteration is driven back. */
double
hl_log_mean (double d1, double d2, double *to_d1, double *to_d2)
{
  const double least = 1e-3;
  double c1 = d1 >= least ? d1 : least, c2 = d2 >= least ? d2 : least;
  double depth = fmin (d1 - c1, 0.0) + fmin (d2 - c2, 0.0);
  double mean = 0.5 * (c1 + c2), diff = c1 - c2, e = diff / mean, value, slope1, slope2;
  if (fabs (e) < 1e-2)
    {
      /* mean (1 - e^2/12 - e^4/180); below e = 0.01 the next term is under 1e-14. */
      value = mean * (1.0 - e * e / 12.0 - e * e * e * e / 180.0);
      double to_e = mean * (-e / 6.0 - e * e * e / 45.0), factor = value / mean;
      slope1 = 0.5 * factor + to_e * (1.0 / mean - 0.5 * e / mean);
      slope2 = 0.5 * factor + to_e * (-1.0 / mean - 0.5 * e / mean);
    }
  else
    {
      double l = log (c1 / c2);
      value = diff / l;
      slope1 = 1.0 / l - diff / (l * l * c1);
      slope2 = -1.0 / l + diff / (l * l * c2);
    }
  double left = value - depth, to_value = value * (value - 2.0 * depth) / (left * left), to_depth = value * value / (left * left);
  *to_d1 = d1 >= least ? to_value * slope1 : to_depth;
  *to_d2 = d2 >= least ? to_value * slope2 : to_depth;
  return value * value / left;
}

static HlStatus
log_mean (G_GNUC_UNUSED const HlEquation *e, G_GNUC_UNUSED const double *a, const double *x, double *r, double *dr)
{
  double to_d1, to_d2;
  *r = x[0] - hl_log_mean (x[1] + x[2], x[2], &to_d1, &to_d2);
  dr[0] = 1.0;
  dr[1] = -to_d1;
  dr[2] = -to_d1 - to_d2;
  return HL_OK;
}

HlEquation *
hl_add_log_mean (HlSystem *system, int mean, int rise, int least)
{
  return with (ADD (log_mean, HL_VAR_TEMPERATURE_DIFFERENCE, 1, mean, rise, least), NULL, N_("{0} = {1} ÷ ln(({1} + {2}) ÷ {2})"), 0);
}

/* --- ties ----------------------------------------------------------------- */

/* a: for each variable, the target first, whether it is a pressure. */
static HlStatus
tie (const HlEquation *e, const double *a, const double *x, double *r, double *dr)
{
  double of[HL_EQUATION_MOST], value;
  for (int k = 1; k < e->n; k++)
    of[k - 1] = a[k] > 0.0 ? exp (x[k]) : x[k];
  if (!hl_tie_evaluate (e->tie, of, &value, dr + 1) || (a[0] > 0.0 && !(value > 0.0)))
    return HL_OUTSIDE_RANGE;
  *r = x[0] - (a[0] > 0.0 ? log (value) : value);
  dr[0] = 1.0;
  for (int k = 1; k < e->n; k++)
    dr[k] *= -(a[k] > 0.0 ? of[k - 1] : 1.0) / (a[0] > 0.0 ? value : 1.0);
  return HL_OK;
}

HlEquation *
hl_add_tie (HlSystem *system, int dst, const HlTie *of_quantities, const int *of)
{
  int vars[HL_EQUATION_MOST], n = (int) hl_tie_n_of (of_quantities) + 1;
  double a[HL_EQUATION_MOST];
  HlVarKind kind = hl_system_var (system, dst)->kind;
  gboolean has_pressure = FALSE;
  g_assert (n <= HL_EQUATION_MOST);
  for (int k = 0; k < n; k++)
    {
      vars[k] = k == 0 ? dst : of[k - 1];
      a[k] = hl_system_var (system, vars[k])->kind == HL_VAR_PRESSURE ? 1.0 : 0.0;
      has_pressure |= a[k] > 0.0;
    }
  guint32 linear_in = hl_tie_is_linear (of_quantities) && !has_pressure ? HL_ALL_LINEAR : 1;
  HlEquation *e = hl_system_add_equation (system, tie, kind, linear_in, vars, n, a, n);
  e->tie = of_quantities;
  return e;
}

gboolean hl_equation_is_tie (const HlEquation *e) { return e->residual == tie; }

gboolean
hl_equation_wants_saturation (const HlEquation *e)
{
  return e->residual == saturation || e->residual == liquid || e->residual == vapour || e->residual == subcooled_temperature || e->residual == enthalpy_at_quality
         || e->residual == enthalpy_at_moisture || e->residual == quality;
}

const char *
hl_equation_source (const HlEquation *e)
{
  if (e->source != NULL)
    return e->source;
  if (e->residual == tie)
    return N_("tie that was put in");
  if (e->is_balance)
    return N_("conservation of mass");
  if (e->residual == energy && e->says == NULL)
    return N_("conservation of energy");
  if (e->residual == expansion || e->residual == compression)
    return N_("definition of the isentropic efficiency");
  if (e->residual == straight_line)
    return N_("straight expansion line in h and s: simplification, no source");
  if (e->residual == log_mean)
    return N_("logarithmic mean of the end differences, counterflow");
  if (e->residual == cooling_heat)
    return N_("conservation of energy");
  return e->fluid != NULL ? N_("property of the medium") : N_("definition");
}

int
hl_equation_property_calls (const HlEquation *e)
{
  if (e->fluid == NULL)
    return 0;
  if (e->residual == expansion || e->residual == compression || e->residual == cooling_heat || e->residual == liquid || e->residual == vapour)
    return 2;
  if (e->residual == straight_line)
    return 3;
  return e->n > 8 ? 7 : 1;   /* the zones of a heater; one state */
}
