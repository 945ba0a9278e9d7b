/* Why a gas mixture has no state there: sentences that name the limit.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "fluid/gas-private.h"

#include <math.h>

HlStatus
hl_gas_no_state (const HlFluid *fluid G_GNUC_UNUSED, double a G_GNUC_UNUSED, double b G_GNUC_UNUSED, HlState *state G_GNUC_UNUSED)
{
  return HL_OUTSIDE_RANGE;
}

HlStatus
hl_gas_no_saturation (const HlFluid *fluid G_GNUC_UNUSED, double a G_GNUC_UNUSED, HlSaturation *saturation G_GNUC_UNUSED)
{
  return HL_OUTSIDE_RANGE;
}

static char *
explain_pressure (double p)
{
  if (!(p > 0.0))
    return g_strdup_printf ("%g bar is no absolute pressure; it must lie above 0 and at most at %g bar", p / 1e5, HL_GAS_P_MAX / 1e5);
  if (!(p <= HL_GAS_P_MAX))
    return g_strdup_printf ("%g bar is above %g bar, to which a gas is computed as ideal", p / 1e5, HL_GAS_P_MAX / 1e5);
  return NULL;
}

static char *
explain_ice (const HlGas *gas, double p)
{
  if (hl_gas_is_icy (gas, p, fmin (HL_GAS_T_ICE - 1e-9, fmax (gas->fluid.limits.T_min, 200.0))) || gas->y_water * p > hl_gas_ice_pressure (HL_GAS_T_ICE))
    return g_strdup_printf ("at %g bar the water in the gas (%g of its moles) would freeze out; ice is not computed", p / 1e5, gas->y_water);
  return NULL;
}

static char *
explain_temperature (const HlGas *gas, double T)
{
  const HlFluidLimits *limits = &gas->fluid.limits;
  if (!(T >= limits->T_min))
    return g_strdup_printf ("%g K is below %g K, the lowest temperature of the polynomials of this gas", T, limits->T_min);
  if (!(T <= limits->T_max))
    return g_strdup_printf ("%g K is above %g K, the highest temperature of the polynomials of this gas", T, limits->T_max);
  return NULL;
}

static char *
explain_pT (const HlGas *gas, double p, double T)
{
  char *text = explain_pressure (p);
  if (text == NULL)
    text = explain_temperature (gas, T);
  return text != NULL ? text : explain_ice (gas, p);
}

static char *
explain_from_p (const HlGas *gas, double p, gboolean is_entropy, double value)
{
  const char *unit = is_entropy ? "kJ/(kg K)" : "kJ/kg", *what = is_entropy ? "entropy" : "enthalpy";
  char *text = explain_pressure (p);
  HlState hot;
  if (text != NULL)
    return text;
  if (!isfinite (value))
    return g_strdup_printf ("%g %s is no %s", value / 1e3, unit, what);
  double T_max = gas->fluid.limits.T_max, T_min = gas->fluid.limits.T_min;
  if (hl_gas_state_pT (&gas->fluid, p, T_max, &hot) != HL_OK)
    return NULL;
  double limit = is_entropy ? hot.s : hot.h;
  if (value > limit)
    return g_strdup_printf ("%g %s at %g bar is above %g %s, the %s at %g K, the highest temperature of the polynomials of this gas",
                            value / 1e3, unit, p / 1e5, limit / 1e3, unit, what, T_max);
  text = explain_ice (gas, p);
  if (text != NULL)
    return text;
  return g_strdup_printf ("%g %s at %g bar lies below %g K, the lowest temperature of the polynomials of this gas", value / 1e3, unit, p / 1e5, T_min);
}

static char *
explain_no_dome (const HlGas *gas)
{
  if (gas->y_water > 0.0)
    return g_strdup ("a gas has no boiling pressure: its water condenses over a range of temperatures below the dew point; give pressure and temperature, or pressure and enthalpy");
  return g_strdup ("a gas has no saturation; give pressure and temperature, or pressure and enthalpy");
}

/**
 * hl_gas_explain_failure:
 * @fluid: a gas
 * @status: what the call returned
 * @pair: "pT", "ph", "ps", "hs", "px", "Tx" or "dT"
 * @a: first of the pair, SI
 * @b: second of the pair, SI
 *
 * Returns: (transfer full): a sentence without full stop
 */
char *
hl_gas_explain_failure (const HlFluid *fluid, HlStatus status, const char *pair, double a, double b)
{
  const HlGas *gas = hl_gas_of (fluid);
  char *text = NULL;
  if (status == HL_OUTSIDE_RANGE && pair != NULL)
    {
      if (g_str_equal (pair, "px") || g_str_equal (pair, "Tx"))
        text = explain_no_dome (gas);
      else if (g_str_equal (pair, "pT"))
        text = explain_pT (gas, a, b);
      else if (g_str_equal (pair, "ph") || g_str_equal (pair, "ps"))
        text = explain_from_p (gas, a, pair[1] == 's', b);
      else if (g_str_equal (pair, "dT"))
        text = !(a > 0.0 && isfinite (a)) ? g_strdup_printf ("%g kg/m3 is no density; it must lie above 0", a) : explain_pT (gas, a * gas->R * b, b);
      else if (g_str_equal (pair, "hs"))
        text = g_strdup_printf ("%g kJ/kg with %g kJ/(kg K) lies outside the pressures (to %g bar) and temperatures (%g K to %g K) of this gas",
                                a / 1e3, b / 1e3, HL_GAS_P_MAX / 1e5, fluid->limits.T_min, fluid->limits.T_max);
    }
  return text != NULL ? text : g_strdup_printf ("%s = (%g, %g): %s", pair, a, b, hl_status_describe (status));
}
