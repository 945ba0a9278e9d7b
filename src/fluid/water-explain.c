/* Sentences that name the limit which a call for water and steam broke.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "fluid/water-private.h"

#include <math.h>

#define NAME "IAPWS-IF97"

static char *
explain_pressure (double p)
{
  if (!(p > 0.0))
    return g_strdup_printf ("%g bar is no absolute pressure; it must lie above 0 and at most at %g bar", p / 1e5, HL_IF97_P_MAX / 1e5);
  if (!(p <= HL_IF97_P_MAX))
    return g_strdup_printf ("%g bar is above %g bar, the highest pressure of " NAME, p / 1e5, HL_IF97_P_MAX / 1e5);
  return NULL;
}

static char *
explain_temperature (double T)
{
  if (!(T >= HL_IF97_T_MIN))
    return g_strdup_printf ("%g K is below %g K, the lowest temperature of " NAME, T, HL_IF97_T_MIN);
  if (!(T <= HL_IF97_T_MAX))
    return g_strdup_printf ("%g K is above %g K, the highest temperature of " NAME, T, HL_IF97_T_MAX);
  return NULL;
}

static char *
explain_pT (double p, double T)
{
  char *text = explain_pressure (p);
  if (text == NULL)
    text = explain_temperature (T);
  if (text == NULL && T > HL_IF97_T_25 && p > HL_IF97_P_MAX_5)
    text = g_strdup_printf ("%g bar is above %g bar, the highest pressure of " NAME " for temperatures above %g K (here %g K)",
                            p / 1e5, HL_IF97_P_MAX_5 / 1e5, HL_IF97_T_25, T);
  return text;
}

/* h or s at the coldest or hottest state of this pressure. */
static double
value_at (gboolean is_h, double p, double T)
{
  HlState state;
  if (hl_water_state_pT (&hl_water_if97, p, T, &state) != HL_OK)
    return NAN;
  return is_h ? state.h : state.s;
}

static char *
explain_inverse (gboolean is_h, double p, double value)
{
  const char *what = is_h ? "enthalpy" : "entropy", *unit = is_h ? "kJ/kg" : "kJ/(kg K)";
  double T_max = p > HL_IF97_P_MAX_5 ? HL_IF97_T_25 : HL_IF97_T_MAX;
  char *text = explain_pressure (p);
  if (text != NULL)
    return text;
  if (!isfinite (value))
    return g_strdup_printf ("%g %s is no %s", value / 1e3, unit, what);
  double lowest = value_at (is_h, p, HL_IF97_T_MIN), highest = value_at (is_h, p, T_max);
  if (value < lowest)
    return g_strdup_printf ("%g %s at %g bar is below %g %s, the %s at %g K, the lowest temperature of " NAME,
                            value / 1e3, unit, p / 1e5, lowest / 1e3, unit, what, HL_IF97_T_MIN);
  if (value > highest)
    return g_strdup_printf ("%g %s at %g bar is above %g %s, the %s at %g K, the highest temperature of " NAME " at this pressure",
                            value / 1e3, unit, p / 1e5, highest / 1e3, unit, what, T_max);
  return NULL;
}

static char *
explain_hs (double h, double s)
{
  HlState state;
  if (!isfinite (h) || !isfinite (s))
    return g_strdup_printf ("%g kJ/kg and %g kJ/(kg K) are no pair of enthalpy and entropy", h / 1e3, s / 1e3);
  if (hl_water_state_ph (&hl_water_if97, HL_IF97_P_MAX, h, &state) == HL_OK && s < state.s)
    return g_strdup_printf ("%g kJ/kg with %g kJ/(kg K) needs more than %g bar, the highest pressure of " NAME
                            ", where the entropy is %g kJ/(kg K)", h / 1e3, s / 1e3, HL_IF97_P_MAX / 1e5, state.s / 1e3);
  if (hl_water_state_ph (&hl_water_if97, HL_IF97_P_MIN_SAT, h, &state) == HL_OK && s > state.s)
    return g_strdup_printf ("%g kJ/kg with %g kJ/(kg K) needs less than %g Pa, where it would be colder than %g K, the lowest temperature of "
                            NAME, h / 1e3, s / 1e3, HL_IF97_P_MIN_SAT, HL_IF97_T_MIN);
  return g_strdup_printf ("%g kJ/kg with %g kJ/(kg K) lies outside the pressures (to %g bar) and temperatures (%g K to %g K, above %g bar to %g K) of "
                          NAME, h / 1e3, s / 1e3, HL_IF97_P_MAX / 1e5, HL_IF97_T_MIN, HL_IF97_T_MAX, HL_IF97_P_MAX_5 / 1e5, HL_IF97_T_25);
}

static char *
explain_quality (double x)
{
  if (!(x >= 0.0 && x <= 1.0))
    return g_strdup_printf ("%g is no vapour mass fraction; it must lie between 0 and 1", x);
  return NULL;
}

static char *
explain_px (double p, double x)
{
  char *text = explain_pressure (p);
  if (text != NULL)
    return text;
  if (p < HL_IF97_P_MIN_SAT)
    return g_strdup_printf ("%g Pa is below %g Pa, the saturation pressure at %g K, where the saturation line of " NAME " begins",
                            p, HL_IF97_P_MIN_SAT, HL_IF97_T_MIN);
  if (p > HL_IF97_P_CRITICAL)
    return g_strdup_printf ("%g bar is above %g bar, the critical pressure: there is no saturation", p / 1e5, HL_IF97_P_CRITICAL / 1e5);
  return explain_quality (x);
}

static char *
explain_Tx (double T, double x)
{
  char *text = explain_temperature (T);
  if (text != NULL)
    return text;
  if (T > HL_IF97_T_CRITICAL)
    return g_strdup_printf ("%g K is above %g K, the critical temperature: there is no saturation", T, HL_IF97_T_CRITICAL);
  return explain_quality (x);
}

static char *
explain_ph (double p, double h)
{
  return explain_inverse (TRUE, p, h);
}

static char *
explain_ps (double p, double s)
{
  return explain_inverse (FALSE, p, s);
}

/**
 * hl_water_explain_failure:
 * @fluid: water
 * @status: what the call returned
 * @pair: "pT", "ph", "ps", "hs", "px" or "Tx"
 * @a: first of the pair, SI
 * @b: second of the pair, SI
 *
 * Returns: (transfer full): a sentence without full stop
 */
char *
hl_water_explain_failure (const HlFluid *fluid G_GNUC_UNUSED, HlStatus status, const char *pair, double a, double b)
{
  static const struct { const char *pair; char *(*explain) (double a, double b); } rows[] = {
    { "pT", explain_pT }, { "ph", explain_ph }, { "ps", explain_ps },
    { "hs", explain_hs }, { "px", explain_px }, { "Tx", explain_Tx },
  };
  if (status == HL_OUTSIDE_RANGE)
    for (gsize i = 0; i < G_N_ELEMENTS (rows); i++)
      if (g_strcmp0 (pair, rows[i].pair) == 0)
        {
          char *text = rows[i].explain (a, b);
          if (text != NULL)
            return text;
        }
  return g_strdup_printf ("%s = (%g, %g): %s", pair, a, b, hl_status_describe (status));
}
