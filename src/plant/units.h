/* Dimensions, unit sets, and text in and out.  Inside everything is SI.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#pragma once
#include "fluid/fluid.h"
G_BEGIN_DECLS

typedef enum {
  HL_DIMENSION_RATIO,                    /* efficiency, fraction, quality: "0.83" or "83 %" */
  HL_DIMENSION_PRESSURE,                 /* absolute */
  HL_DIMENSION_PRESSURE_DIFFERENCE,
  HL_DIMENSION_TEMPERATURE,
  HL_DIMENSION_TEMPERATURE_DIFFERENCE,   /* "3 K"; a degree Fahrenheit scales by 5/9 without 32 */
  HL_DIMENSION_MASS_FLOW,
  HL_DIMENSION_ENTHALPY,                 /* specific */
  HL_DIMENSION_ENTROPY,                  /* specific */
  HL_DIMENSION_VOLUME,                   /* specific */
  HL_DIMENSION_POWER,                    /* power and heat flow */
  HL_DIMENSION_CONDUCTANCE,              /* UA */
  HL_DIMENSION_LENGTH,
  HL_DIMENSION_HEAT_RATE,                /* J/J, shown as kJ/kWh or Btu/kWh */
  HL_DIMENSION_STEAM_RATE,               /* kg/J, shown as kg/kWh or lb/kWh */
  HL_DIMENSION_VOLUME_FLOW,
  HL_DIMENSION_EMISSION,                 /* kg/J, shown as kg/MWh or lb/MWh */
  HL_DIMENSION_AREA,
  HL_DIMENSION_APERTURE,                 /* an area of land or collectors, shown as m2 or ft2 */
  HL_DIMENSION_IRRADIANCE,               /* W/m2 */
  HL_DIMENSION_COUNT,                    /* a plain number */
  HL_N_DIMENSIONS
} HlDimension;

typedef enum { HL_UNITS_METRIC, HL_UNITS_SI, HL_UNITS_US, HL_N_UNIT_SETS } HlUnitSet;

#define HL_UNITS_ERROR (hl_units_error_quark ())
HL_PUBLIC GQuark hl_units_error_quark (void);
typedef enum {
  HL_UNITS_ERROR_NO_NUMBER,       /* no number where one must stand */
  HL_UNITS_ERROR_UNKNOWN_UNIT,    /* not a unit we know */
  HL_UNITS_ERROR_WRONG_DIMENSION, /* a unit, but of another dimension */
  HL_UNITS_ERROR_NOT_FINITE,
  HL_UNITS_ERROR_IMPOSSIBLE,      /* below absolute zero or below vacuum */
} HlUnitsError;

/* Text with or without a unit ("80 bar", "7 barg", "480 °C", "900 F", "35 t/h", "0.92", "83 %", decimal comma
 * accepted) to SI.  A bare number takes the unit of @set.  Gauge pressure uses @site_pressure [Pa].
 * Messages say what was read, what is wrong and which units would do. */
HL_PUBLIC gboolean hl_units_parse (const char *text, HlDimension dimension, HlUnitSet set, double site_pressure,
                                   double *si, GError **error);

/* The unit that a bare number has, and that of the next three: "bar", "°C", "". */
HL_PUBLIC const char *hl_units_label      (HlDimension dimension, HlUnitSet set);
HL_PUBLIC double      hl_units_to_display (double si, HlDimension dimension, HlUnitSet set);
HL_PUBLIC double      hl_units_from_display (double shown, HlDimension dimension, HlUnitSet set);
/* Number alone (its unit is hl_units_label()), and number with unit, rounded as the trade rounds; "–" for NaN.
 * With the unit, a small power is shown in the smaller unit: "40.00 kW", "250 W".  A ratio is "0.830": what is read
 * in percent goes through hl_quantity_format().  Free with g_free(). */
HL_PUBLIC char       *hl_units_format_number (double si, HlDimension dimension, HlUnitSet set);
HL_PUBLIC char       *hl_units_format        (double si, HlDimension dimension, HlUnitSet set);
/* The shortest text with its unit that parses back to the same value, for entries: "80 bar", "40 kW", "0.83". */
HL_PUBLIC char       *hl_units_format_exact  (double si, HlDimension dimension, HlUnitSet set);
HL_PUBLIC char       *hl_units_format_percent (double ratio);              /* "2.5 %", every digit */
/* The unit that hl_units_format() and hl_units_format_exact() choose for this value: "kW" for a small power. */
HL_PUBLIC const char *hl_units_label_of      (double si, HlDimension dimension, HlUnitSet set);
/* Shortest decimal text of a number that reads back to the same number, as in files: "0.1", "1e-05". */
HL_PUBLIC char       *hl_number_to_text      (double number);

HL_PUBLIC const char *hl_dimension_name    (HlDimension dimension);      /* translated: "pressure" */
HL_PUBLIC const char *hl_dimension_si_unit (HlDimension dimension);      /* "Pa", "K", "kg/s" ..., "" for ratio */
HL_PUBLIC const char *hl_dimension_json_suffix (HlDimension dimension);  /* "_Pa", "_K", "_kg_s" ..., "" for ratio */
HL_PUBLIC const char *hl_unit_set_id       (HlUnitSet set);              /* "metric", "si", "us" */
HL_PUBLIC gboolean    hl_unit_set_from_id  (const char *id, HlUnitSet *set);

/* Ambient pressure at an altitude [m] by the troposphere formula of ISO 2533. */
HL_PUBLIC double hl_site_pressure (double altitude);
G_END_DECLS
