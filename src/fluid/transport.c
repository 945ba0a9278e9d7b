/* Viscosity, thermal conductivity and surface tension of media that have them: water by either formulation.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "fluid/transport.h"

#include <math.h>
#include <string.h>

#include "fluid/helmholtz-private.h"
#include "fluid/liquid-private.h"
#include "fluid/transport-private.h"

#define T_CRITICAL 647.096
#define D_CRITICAL 322.0
#define P_CRITICAL 22.064e6

static gboolean
is_water_95 (const HlFluid *fluid)
{
  return g_str_has_prefix (fluid->id, "water-95");
}

/**
 * hl_fluid_has_transport:
 * @fluid: a fluid
 *
 * Returns: whether viscosity, conductivity and surface tension are known for it; of
 *   liquids by polynomials the first two are known, too
 */
gboolean
hl_fluid_has_transport (const HlFluid *fluid)
{
  return fluid == hl_fluid_water () || is_water_95 (fluid);
}

static HlStatus
transport_of_liquid (const HlFluid *fluid, const HlState *state, double (*value_at) (const HlLiquid *, double), double *value)
{
  if (!(state->T >= fluid->limits.T_min && state->T <= fluid->limits.T_max))
    return HL_OUTSIDE_RANGE;
  *value = value_at (hl_liquid_of (fluid), state->T);
  return HL_OK;
}

/* d(density)/dp at 1.5 times the critical temperature.  IAPWS R15-11(2011), Eq. 25
 * with Table 6, serves the industrial form: by ranges of density. */
static double
reference_slope_industrial (double density)
{
  static const struct { double d_max, a[6]; } ranges[] = {
    { 0.310559006, { 6.53786807199516, -5.61149954923348, 3.39624167361325, -2.27492629730878, 10.2631854662709, 1.97815050331519 } },
    { 0.776397516, { 6.52717759281799, -6.30816983387575, 8.08379285492595, -9.82240510197603, 12.1358413791395, -5.54349664571295 } },
    { 1.242236025, { 5.35500529896124, -3.96415689925446, 8.91990208918795, -12.0338729505790, 9.19494865194302, -2.16866274479712 } },
    { 1.863354037, { 1.55225959906681, 0.464621290821181, 8.93237374861479, -11.0321960061126, 6.16780999933360, -0.965458722086812 } },
    { INFINITY, { 1.11999926419994, 0.595748562571649, 9.88952565078920, -10.3255051147040, 4.66861294457414, -0.503243546373828 } },
  };
  double d = density / D_CRITICAL, sum = 0.0;
  gsize r = 0;
  while (d > ranges[r].d_max)
    r++;
  for (gsize i = G_N_ELEMENTS (ranges[r].a); i-- > 0;)
    sum = sum * d + ranges[r].a[i];
  return D_CRITICAL / P_CRITICAL / sum;
}

static double
reference_slope (const HlFluid *fluid, double density)
{
  double p, p_d;
  if (!is_water_95 (fluid))
    return reference_slope_industrial (density);
  hl_helmholtz_pressure (hl_helmholtz_of (fluid), density, 1.5 * T_CRITICAL, &p, &p_d);
  return 1.0 / p_d;
}

/* Highest temperature for a pressure: the last row whose pressure is not exceeded decides. */
typedef struct {
  double p_max, T_max;
} Limit;

static gboolean
is_within (const HlState *state, const Limit *limits, gsize n)
{
  if (state->phase == HL_PHASE_TWO_PHASE || !(state->T >= 273.15))
    return FALSE;
  for (gsize i = 0; i < n; i++)
    if (state->p <= limits[i].p_max)
      return state->T <= limits[i].T_max;
  return FALSE;
}

/**
 * hl_fluid_viscosity:
 * @fluid: a fluid for which hl_fluid_has_transport() holds
 * @state: a state of it in one phase
 * @viscosity: (out): dynamic viscosity [Pa s]; untouched on failure
 *
 * IAPWS R12-08(2008).  With water by the 1995 formulation the growth near the
 * critical point is included; with IF97 it is left out, as the release recommends
 * for industrial use.
 *
 * Returns: HL_OK, or HL_OUTSIDE_RANGE for a mixture, beyond the release's range, or where nothing is known
 */
HlStatus
hl_fluid_viscosity (const HlFluid *fluid, const HlState *state, double *viscosity)
{
  /* R12-08(2008), section 2.2, from memory of the release. */
  if (hl_fluid_is_liquid (fluid))
    return transport_of_liquid (fluid, state, hl_liquid_viscosity, viscosity);
  static const Limit limits[] = { { 300e6, 1173.15 }, { 350e6, 873.15 }, { 500e6, 433.15 }, { 1000e6, 373.15 } };
  if (!hl_fluid_has_transport (fluid) || !is_within (state, limits, G_N_ELEMENTS (limits)))
    return HL_OUTSIDE_RANGE;
  double density = 1.0 / state->v, growth = 1.0;
  if (is_water_95 (fluid))
    growth = hl_water_viscosity_growth (hl_water_correlation_length (state, reference_slope (fluid, density)));
  *viscosity = hl_water_viscosity_background (density, state->T) * growth;
  return HL_OK;
}

/* IAPWS R15-11(2011), Eqs. 18 to 24: what the conductivity gains near the critical point. */
static double
conductivity_growth (const HlFluid *fluid, const HlState *state, double viscosity)
{
  double density = 1.0 / state->v, d = density / D_CRITICAL;
  double y = hl_water_correlation_length (state, reference_slope (fluid, density)) / 0.4;
  if (!(y >= 1.2e-7))
    return 0.0;
  double cp = state->cp / 461.51805, per_kappa = state->cv / state->cp;
  if (!(cp >= 0.0 && cp <= 1e13))
    cp = 1e13;
  double Z = 2.0 / (G_PI * y) * ((1.0 - per_kappa) * atan (y) + per_kappa * y + expm1 (-1.0 / (1.0 / y + y * y / (3.0 * d * d))));
  return 1e-3 * 177.8514 * d * cp * state->T / T_CRITICAL / (viscosity * 1e6) * Z;
}

/**
 * hl_fluid_conductivity:
 * @fluid: a fluid for which hl_fluid_has_transport() holds
 * @state: a state of it in one phase
 * @conductivity: (out): thermal conductivity [W/(m K)]; untouched on failure
 *
 * IAPWS R15-11(2011): with water by the 1995 formulation the form for general and
 * scientific use, with IF97 the industrial form.
 *
 * Returns: HL_OK, or HL_OUTSIDE_RANGE for a mixture, beyond the release's range, or where nothing is known
 */
HlStatus
hl_fluid_conductivity (const HlFluid *fluid, const HlState *state, double *conductivity)
{
  /* R15-11(2011), section 2.2, from memory of the release. */
  static const Limit limits[] = { { 100e6, 1173.15 }, { 250e6, 874.0 }, { 687e6, 573.0 }, { 785e6, 403.0 }, { 1000e6, 348.0 } };
  double viscosity;
  if (hl_fluid_is_liquid (fluid))
    return transport_of_liquid (fluid, state, hl_liquid_conductivity, conductivity);
  if (!hl_fluid_has_transport (fluid) || !is_within (state, limits, G_N_ELEMENTS (limits))
      || hl_fluid_viscosity (fluid, state, &viscosity) != HL_OK)
    return HL_OUTSIDE_RANGE;
  *conductivity = hl_water_conductivity_background (1.0 / state->v, state->T) + conductivity_growth (fluid, state, viscosity);
  return HL_OK;
}

/**
 * hl_fluid_surface_tension:
 * @fluid: a fluid for which hl_fluid_has_transport() holds
 * @T: temperature [K], 273.15 to the critical one
 * @tension: (out): surface tension between liquid and vapour [N/m]; untouched on failure
 *
 * IAPWS R1-76(2014), Eq. 1.
 *
 * Returns: HL_OK or HL_OUTSIDE_RANGE
 */
HlStatus
hl_fluid_surface_tension (const HlFluid *fluid, double T, double *tension)
{
  if (!hl_fluid_has_transport (fluid) || !(T >= 273.15 && T <= T_CRITICAL))
    return HL_OUTSIDE_RANGE;
  double theta = 1.0 - T / T_CRITICAL;
  *tension = 235.8e-3 * pow (theta, 1.256) * (1.0 - 0.625 * theta);
  return HL_OK;
}
