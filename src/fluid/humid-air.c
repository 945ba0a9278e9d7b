/* Humid air: from one measure of its moisture to the others.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "fluid/humid-air.h"

#include <math.h>

#include "fluid/gas-private.h"
#include "fluid/if97-private.h"

#define T_LOWEST 203.15
#define T_HIGHEST 473.15
#define MAX_STEPS 100

/* Per kg: dry air, vapour, and liquid water, with zeros at 273.15 K. */
typedef struct {
  const HlGas           *dry;
  const HlGasPolynomial *vapour;
  double R_over_M;              /* of water [J/(kg K)] */
  double ratio;                 /* molar mass of water to that of dry air */
  double dry_zero, vapour_zero; /* [J/kg] */
} Parts;

/* Vapour: heat of evaporation at 273.15 K by IF97 above the liquid there. */
static const Parts *
parts (void)
{
  static gsize once;
  static Parts made;
  if (g_once_init_enter (&once))
    {
      const HlGasData *data = hl_gas_data ();
      const HlGasSpecies *water = &data->species[data->water];
      HlState liquid, vapour;
      double p = hl_if97_psat (HL_GAS_T_ICE);
      hl_if97_region1 (p, HL_GAS_T_ICE, &liquid);
      hl_if97_region2 (p, HL_GAS_T_ICE, &vapour);
      made.dry = hl_gas_of (hl_gas_lookup ("air", NULL));
      made.vapour = &water->molar;
      made.R_over_M = data->R / water->M;
      made.ratio = water->M / made.dry->M;
      made.dry_zero = hl_gas_h (&made.dry->whole, HL_GAS_T_ICE);
      made.vapour_zero = made.R_over_M * hl_gas_h (made.vapour, HL_GAS_T_ICE) - (vapour.h - liquid.h);
      g_once_init_leave (&once, 1);
    }
  return &made;
}

static double
dry_h (double T)
{
  return hl_gas_h (&parts ()->dry->whole, T) - parts ()->dry_zero;
}

static double
vapour_h (double T)
{
  return parts ()->R_over_M * hl_gas_h (parts ()->vapour, T) - parts ()->vapour_zero;
}

static double
liquid_h (double T)
{
  HlState liquid, zero;
  double p = hl_if97_psat (HL_GAS_T_ICE);
  hl_if97_region1 (fmax (p, hl_if97_psat (T)), T, &liquid);
  hl_if97_region1 (p, HL_GAS_T_ICE, &zero);
  return liquid.h - zero.h;
}

/* Highest pressure of vapour at T: over water, or over ice. */
static double
saturation_pressure (double T)
{
  return T < HL_GAS_T_ICE ? hl_gas_ice_pressure (T) : hl_if97_psat (T);
}

static double
saturated_ratio (double p, double T)
{
  double p_w = saturation_pressure (T);
  return p_w < p ? parts ()->ratio * p_w / (p - p_w) : INFINITY;
}

/* Moisture of air of T that leaves an adiabatic saturator at T_wet, fed with water of T_wet. */
static double
ratio_of_wet_bulb (double p, double T, double T_wet)
{
  double w = saturated_ratio (p, T_wet), h_liquid = liquid_h (T_wet);
  return (w * (vapour_h (T_wet) - h_liquid) - (dry_h (T) - dry_h (T_wet))) / (vapour_h (T) - h_liquid);
}

static double
wet_bulb_of (double p, double T, double w)
{
  double low = HL_GAS_T_ICE, high = T;
  if (!(T > low) || ratio_of_wet_bulb (p, T, low) > w)
    return NAN;
  for (int i = 0; i < MAX_STEPS && high - low > 1e-12 * T; i++)
    {
      double middle = 0.5 * (low + high), there = ratio_of_wet_bulb (p, T, middle);
      *(there > w ? &high : &low) = middle;      /* more moisture, higher wet bulb; infinite where water boils */
    }
  return 0.5 * (low + high);
}

/* Frost point: the pressure over ice rises with T. */
static double
dew_point_of (double p_w)
{
  double low = 100.0, high = HL_GAS_T_ICE;
  if (!(p_w > 0.0))
    return NAN;
  if (p_w >= hl_if97_psat (HL_GAS_T_ICE))
    return hl_if97_Tsat (p_w);
  for (int i = 0; i < MAX_STEPS && high - low > 1e-12 * high; i++)
    {
      double middle = 0.5 * (low + high);
      *(hl_gas_ice_pressure (middle) > p_w ? &high : &low) = middle;
    }
  return 0.5 * (low + high);
}

static gboolean
is_air (double p, double T)
{
  return p > 0.0 && p <= HL_GAS_P_MAX && T >= T_LOWEST && T <= T_HIGHEST;
}

/**
 * hl_humid_air_by_ratio:
 * @p: pressure [Pa]
 * @T: dry bulb temperature [K], 203.15 to 473.15
 * @humidity_ratio: kg of vapour per kg of dry air, at least 0
 * @air: (out): everything about it; untouched on failure
 *
 * Returns: HL_OK; HL_OUTSIDE_RANGE off the temperatures, or where the air cannot hold that much as vapour
 */
HlStatus
hl_humid_air_by_ratio (double p, double T, double humidity_ratio, HlHumidAir *air)
{
  double w = humidity_ratio;
  if (!is_air (p, T) || !(w >= 0.0) || !(w <= saturated_ratio (p, T) * (1.0 + 1e-12)))
    return HL_OUTSIDE_RANGE;
  double ratio = parts ()->ratio, p_w = p * w / (ratio + w);
  *air = (HlHumidAir) {
    .p = p, .T = T, .humidity_ratio = w, .relative_humidity = p_w / saturation_pressure (T),
    .T_dew = dew_point_of (p_w), .T_wet = wet_bulb_of (p, T, w),
    .h = dry_h (T) + w * vapour_h (T), .v = parts ()->dry->R * T * (1.0 + w / ratio) / p,
  };
  return HL_OK;
}

/**
 * hl_humid_air_by_relative_humidity:
 * @p: pressure [Pa]
 * @T: dry bulb temperature [K], 203.15 to 473.15
 * @relative_humidity: 0 to 1
 * @air: (out): everything about it; untouched on failure
 *
 * Returns: HL_OK or HL_OUTSIDE_RANGE
 */
HlStatus
hl_humid_air_by_relative_humidity (double p, double T, double relative_humidity, HlHumidAir *air)
{
  if (!is_air (p, T) || !(relative_humidity >= 0.0 && relative_humidity <= 1.0))
    return HL_OUTSIDE_RANGE;
  double p_w = relative_humidity * saturation_pressure (T);
  return p_w < p ? hl_humid_air_by_ratio (p, T, parts ()->ratio * p_w / (p - p_w), air) : HL_OUTSIDE_RANGE;
}

/**
 * hl_humid_air_by_wet_bulb:
 * @p: pressure [Pa]
 * @T: dry bulb temperature [K], 273.15 to 473.15
 * @T_wet: wet bulb temperature [K], 273.15 to @T
 * @air: (out): everything about it; untouched on failure
 *
 * Returns: HL_OK; HL_OUTSIDE_RANGE also where dry air already has a higher wet bulb than that
 */
HlStatus
hl_humid_air_by_wet_bulb (double p, double T, double T_wet, HlHumidAir *air)
{
  if (!is_air (p, T) || !(T_wet >= HL_GAS_T_ICE && T_wet <= T) || !(saturation_pressure (T_wet) < p))
    return HL_OUTSIDE_RANGE;
  HlStatus status = hl_humid_air_by_ratio (p, T, ratio_of_wet_bulb (p, T, T_wet), air);
  if (status == HL_OK)
    air->T_wet = T_wet;
  return status;
}

/**
 * hl_humid_air_saturated:
 * @p: pressure [Pa]
 * @T: temperature [K], 273.15 to 473.15 and below the boiling point of water at @p
 * @air: (out): moisture and enthalpy per kg of dry air, with slopes along T; untouched on failure
 *
 * Returns: HL_OK or HL_OUTSIDE_RANGE
 */
HlStatus
hl_humid_air_saturated (double p, double T, HlSaturatedAir *air)
{
  double p_w_T, p_w;
  if (!is_air (p, T) || T < HL_GAS_T_ICE || !((p_w = hl_if97_psat_T (T, &p_w_T)) < p))
    return HL_OUTSIDE_RANGE;
  double w = parts ()->ratio * p_w / (p - p_w), w_T = parts ()->ratio * p * p_w_T / ((p - p_w) * (p - p_w)), h_v = vapour_h (T);
  *air = (HlSaturatedAir) {
    .humidity_ratio = w, .humidity_ratio_T = w_T, .h = dry_h (T) + w * h_v,
    .h_T = hl_gas_cp (&parts ()->dry->whole, T) + w_T * h_v + w * parts ()->R_over_M * hl_gas_cp (parts ()->vapour, T),
  };
  return HL_OK;
}

/**
 * hl_humid_air_gas:
 * @humidity_ratio: kg of vapour per kg of dry air, at least 0
 * @error: says what is wrong
 *
 * Returns: (nullable): the medium with this moisture
 */
const HlFluid *
hl_humid_air_gas (double humidity_ratio, GError **error)
{
  const HlGasData *data = hl_gas_data ();
  double moles[HL_GAS_MAX_SPECIES];
  for (guint i = 0; i < data->n_species; i++)
    moles[i] = parts ()->dry->y[i];
  moles[data->water] += humidity_ratio / parts ()->ratio;
  return hl_gas_by_moles (moles, error);
}
