/* Sentences that name the limit which a call for a Helmholtz fluid broke.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "fluid/helmholtz-private.h"

#include <math.h>

static char *
explain_pressure (const HlHelmholtz *eq, double p)
{
  if (!(p > 0.0))
    return g_strdup_printf ("%g bar is no absolute pressure; it must lie above 0 and at most at %g bar", p / 1e5, eq->p_max / 1e5);
  if (!(p <= eq->p_max))
    return g_strdup_printf ("%g bar is above %g bar, the highest pressure of %s", p / 1e5, eq->p_max / 1e5, eq->fluid.formulation);
  return NULL;
}

static char *
explain_temperature (const HlHelmholtz *eq, double T)
{
  if (!(T >= eq->T_min))
    return g_strdup_printf ("%g K is below %g K, the lowest temperature of %s", T, eq->T_min, eq->fluid.formulation);
  if (!(T <= eq->T_max))
    return g_strdup_printf ("%g K is above %g K, the highest temperature of %s", T, eq->T_max, eq->fluid.formulation);
  return NULL;
}

static char *
explain_pT (const HlHelmholtz *eq, double p, double T)
{
  char *text = explain_pressure (eq, p);
  return text != NULL ? text : explain_temperature (eq, T);
}

static char *
explain_inverse (const HlHelmholtz *eq, HlHeld held, double p, double value)
{
  const char *what = held == HL_HELD_H ? "enthalpy" : "entropy", *unit = held == HL_HELD_H ? "kJ/kg" : "kJ/(kg K)";
  HlState edge;
  HlSide side;
  char *text = explain_pressure (eq, p);
  if (text != NULL)
    return text;
  if (!isfinite (value))
    return g_strdup_printf ("%g %s is no %s", value / 1e3, unit, what);
  if (hl_helmholtz_from_p (eq, p, held, value, &edge, &side) != HL_OUTSIDE_RANGE || side == HL_SIDE_NONE)
    return NULL;
  double T = side == HL_SIDE_COLD ? eq->T_min : eq->T_max;
  if (hl_helmholtz_state_pT (&eq->fluid, p, T, &edge) != HL_OK)
    return NULL;
  return g_strdup_printf ("%g %s at %g bar is %s %g %s, the %s at %g K, the %s temperature of %s", value / 1e3, unit, p / 1e5,
                          side == HL_SIDE_COLD ? "below" : "above", (held == HL_HELD_H ? edge.h : edge.s) / 1e3, unit, what, T,
                          side == HL_SIDE_COLD ? "lowest" : "highest", eq->fluid.formulation);
}

static char *
explain_hs (const HlHelmholtz *eq, double h, double s)
{
  HlState state;
  HlSide side;
  if (!isfinite (h) || !isfinite (s))
    return g_strdup_printf ("%g kJ/kg and %g kJ/(kg K) are no pair of enthalpy and entropy", h / 1e3, s / 1e3);
  if (hl_helmholtz_from_p (eq, eq->p_max, HL_HELD_H, h, &state, &side) == HL_OK && s < state.s)
    return g_strdup_printf ("%g kJ/kg with %g kJ/(kg K) needs more than %g bar, the highest pressure of %s, where the entropy is %g kJ/(kg K)",
                            h / 1e3, s / 1e3, eq->p_max / 1e5, eq->fluid.formulation, state.s / 1e3);
  return g_strdup_printf ("%g kJ/kg with %g kJ/(kg K) lies outside the pressures (to %g bar) and temperatures (%g K to %g K) of %s",
                          h / 1e3, s / 1e3, eq->p_max / 1e5, eq->T_min, eq->T_max, eq->fluid.formulation);
}

static char *
explain_quality (double x)
{
  if (!(x >= 0.0 && x <= 1.0))
    return g_strdup_printf ("%g is no vapour mass fraction; it must lie between 0 and 1", x);
  return NULL;
}

static char *
explain_px (const HlHelmholtz *eq, double p, double x)
{
  char *text = explain_pressure (eq, p);
  if (text != NULL)
    return text;
  if (p < eq->p_min_sat)
    return g_strdup_printf ("%g Pa is below %g Pa, the saturation pressure at %g K, where the saturation line of %s begins",
                            p, eq->p_min_sat, eq->T_min, eq->fluid.formulation);
  if (p > eq->pc)
    return g_strdup_printf ("%g bar is above %g bar, the critical pressure: there is no saturation", p / 1e5, eq->pc / 1e5);
  return explain_quality (x);
}

static char *
explain_Tx (const HlHelmholtz *eq, double T, double x)
{
  char *text = explain_temperature (eq, T);
  if (text != NULL)
    return text;
  if (T > eq->Tc)
    return g_strdup_printf ("%g K is above %g K, the critical temperature: there is no saturation", T, eq->Tc);
  return explain_quality (x);
}

static char *
explain_dT (const HlHelmholtz *eq, double density, double T)
{
  HlState state;
  char *text = explain_temperature (eq, T);
  if (text != NULL)
    return text;
  if (!(density > 0.0 && isfinite (density)))
    return g_strdup_printf ("%g kg/m3 is no density; it must lie above 0", density);
  hl_helmholtz_state (eq, density, T, &state);
  return g_strdup_printf ("%g kg/m3 at %g K needs %g bar, which is not between 0 and %g bar, the highest pressure of %s",
                          density, T, state.p / 1e5, eq->p_max / 1e5, eq->fluid.formulation);
}

static char *
explain_ph (const HlHelmholtz *eq, double p, double h)
{
  return explain_inverse (eq, HL_HELD_H, p, h);
}

static char *
explain_ps (const HlHelmholtz *eq, double p, double s)
{
  return explain_inverse (eq, HL_HELD_S, p, s);
}

/**
 * hl_helmholtz_explain_failure:
 * @fluid: a Helmholtz fluid
 * @status: what the call returned
 * @pair: "pT", "ph", "ps", "hs", "px", "Tx" or "dT"
 * @a: first of the pair, SI
 * @b: second of the pair, SI
 *
 * Returns: (transfer full): a sentence without full stop
 */
char *
hl_helmholtz_explain_failure (const HlFluid *fluid, HlStatus status, const char *pair, double a, double b)
{
  static const struct { const char *pair; char *(*explain) (const HlHelmholtz *eq, double a, double b); } rows[] = {
    { "pT", explain_pT }, { "ph", explain_ph }, { "ps", explain_ps }, { "hs", explain_hs },
    { "px", explain_px }, { "Tx", explain_Tx }, { "dT", explain_dT },
  };
  if (status == HL_OUTSIDE_RANGE)
    for (gsize i = 0; i < G_N_ELEMENTS (rows); i++)
      if (g_strcmp0 (pair, rows[i].pair) == 0)
        {
          char *text = rows[i].explain (hl_helmholtz_of (fluid), a, b);
          if (text != NULL)
            return text;
        }
  return g_strdup_printf ("%s = (%g, %g): %s", pair, a, b, hl_status_describe (status));
}
