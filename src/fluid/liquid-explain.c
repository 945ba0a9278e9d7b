/* Why a liquid has no state there: sentences that name the limit.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "fluid/liquid-private.h"

#include <math.h>

HlStatus
hl_liquid_no_state (const HlFluid *fluid G_GNUC_UNUSED, double a G_GNUC_UNUSED, double b G_GNUC_UNUSED, HlState *state G_GNUC_UNUSED)
{
  return HL_OUTSIDE_RANGE;
}

HlStatus
hl_liquid_no_saturation (const HlFluid *fluid G_GNUC_UNUSED, double a G_GNUC_UNUSED, HlSaturation *saturation G_GNUC_UNUSED)
{
  return HL_OUTSIDE_RANGE;
}

static char *
explain_pressure (const HlFluid *fluid, double p)
{
  if (!(p > 0.0 && p <= fluid->limits.p_max))
    return g_strdup_printf ("%g bar lies outside of 0 to %g bar, the pressures of %s", p / 1e5, fluid->limits.p_max / 1e5, fluid->id);
  return NULL;
}

static char *
explain_temperature (const HlFluid *fluid, double T)
{
  if (!(T >= fluid->limits.T_min))
    return g_strdup_printf ("%g K is below %g K, the lowest temperature of %s", T, fluid->limits.T_min, fluid->id);
  if (!(T <= fluid->limits.T_max))
    return g_strdup_printf ("%g K is above %g K, the highest temperature of %s", T, fluid->limits.T_max, fluid->id);
  return NULL;
}

static char *
explain_from_p (const HlFluid *fluid, double p, gboolean is_entropy, double value)
{
  const char *unit = is_entropy ? "kJ/(kg K)" : "kJ/kg", *what = is_entropy ? "entropy" : "enthalpy";
  char *text = explain_pressure (fluid, p);
  HlState cold, hot;
  if (text != NULL)
    return text;
  if (!isfinite (value))
    return g_strdup_printf ("%g %s is no %s", value / 1e3, unit, what);
  if (hl_liquid_state_pT (fluid, p, fluid->limits.T_min, &cold) != HL_OK || hl_liquid_state_pT (fluid, p, fluid->limits.T_max, &hot) != HL_OK)
    return NULL;
  gboolean is_cold = value < (is_entropy ? cold.s : cold.h);
  const HlState *edge = is_cold ? &cold : &hot;
  return g_strdup_printf ("%g %s at %g bar is %s %g %s, the %s at %g K, the %s temperature of %s", value / 1e3, unit, p / 1e5, is_cold ? "below" : "above",
                          (is_entropy ? edge->s : edge->h) / 1e3, unit, what, edge->T, is_cold ? "lowest" : "highest", fluid->id);
}

/**
 * hl_liquid_explain_failure:
 * @fluid: a liquid
 * @status: what the call returned
 * @pair: "pT", "ph", "ps", "hs", "px", "Tx" or "dT"
 * @a: first of the pair, SI
 * @b: second of the pair, SI
 *
 * Returns: (transfer full): a sentence without full stop
 */
char *
hl_liquid_explain_failure (const HlFluid *fluid, HlStatus status, const char *pair, double a, double b)
{
  char *text = NULL;
  if (status == HL_OUTSIDE_RANGE && pair != NULL)
    {
      if (g_str_equal (pair, "px") || g_str_equal (pair, "Tx"))
        text = g_strdup_printf ("%s is a liquid without vapour; give pressure and temperature, or pressure and enthalpy", fluid->id);
      else if (g_str_equal (pair, "dT"))
        text = g_strdup_printf ("the density of %s depends on temperature alone, so density and temperature leave its pressure open", fluid->id);
      else if (g_str_equal (pair, "pT"))
        {
          text = explain_pressure (fluid, a);
          if (text == NULL)
            text = explain_temperature (fluid, b);
        }
      else if (g_str_equal (pair, "ph") || g_str_equal (pair, "ps"))
        text = explain_from_p (fluid, a, pair[1] == 's', b);
      else if (g_str_equal (pair, "hs"))
        text = g_strdup_printf ("%g kJ/kg with %g kJ/(kg K) lies outside the pressures (to %g bar) and temperatures (%g K to %g K) of %s", a / 1e3, b / 1e3,
                                fluid->limits.p_max / 1e5, fluid->limits.T_min, fluid->limits.T_max, fluid->id);
    }
  return text != NULL ? text : g_strdup_printf ("%s = (%g, %g): %s", pair, a, b, hl_status_describe (status));
}
