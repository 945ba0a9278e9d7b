/* Humid air for cooling towers, air-cooled condensers and combustion: moisture, wet bulb, enthalpy.  SI throughout.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#pragma once
#include "fluid/fluid.h"
G_BEGIN_DECLS

/* Dry air and water vapour as ideal gases; enthalpy and volume are those of 1 kg of
 * dry air with its moisture, the enthalpy with zeros at dry air and liquid water of
 * 273.15 K, as psychrometric charts have it. */
typedef struct {
  double p, T;                  /* pressure [Pa], dry bulb temperature [K] */
  double humidity_ratio;        /* kg of vapour per kg of dry air [-] */
  double relative_humidity;     /* over liquid water, below 273.15 K over ice [-] */
  double T_dew;                 /* below 273.15 K the frost point [K]; NaN for dry air */
  double T_wet;                 /* of adiabatic saturation [K]; NaN where it lies below 273.15 K */
  double h, v;                  /* [J/kg], [m3/kg] of dry air */
} HlHumidAir;

/* T from 203.15 K to 473.15 K; untouched on failure. */
HL_PUBLIC HlStatus hl_humid_air_by_relative_humidity (double p, double T, double relative_humidity, HlHumidAir *air) G_GNUC_WARN_UNUSED_RESULT;
HL_PUBLIC HlStatus hl_humid_air_by_wet_bulb          (double p, double T, double T_wet, HlHumidAir *air) G_GNUC_WARN_UNUSED_RESULT;
HL_PUBLIC HlStatus hl_humid_air_by_ratio             (double p, double T, double humidity_ratio, HlHumidAir *air) G_GNUC_WARN_UNUSED_RESULT;

/* Saturated air, for cooling towers: humidity ratio and enthalpy with their slopes along T [1/K], [J/(kg K)]. */
typedef struct { double humidity_ratio, humidity_ratio_T, h, h_T; } HlSaturatedAir;
HL_PUBLIC HlStatus hl_humid_air_saturated (double p, double T, HlSaturatedAir *air) G_GNUC_WARN_UNUSED_RESULT;

/* The same air as a medium, such as "gas:N2=0.77,O2=0.207,..."; NULL where the ratio is none. */
HL_PUBLIC const HlFluid *hl_humid_air_gas (double humidity_ratio, GError **error);

G_END_DECLS
