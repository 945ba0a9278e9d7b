/* Dimensions and unit sets: what is shown, and how it is rounded.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "plant/units-private.h"
#include "plant/i18n.h"
#include <math.h>
#include <string.h>

/* Rounding (common practice, no source): p 4 digits, T 0.1 K, h 0.1 kJ/kg, m 0.01 kg/s, x 0.001, power 0.1 %, heat rate 1.
 * At least @decimals decimals and at least @digits significant digits, so that small values stay readable. */
typedef struct { int decimals, digits; } Rounding;
typedef struct {
  const char *name, *si_unit, *json_suffix;
  const char *labels[HL_N_UNIT_SETS];      /* each a row of the table of units */
  Rounding    rounding;
} Dimension;

static const Dimension dimensions[HL_N_DIMENSIONS] = {
  [HL_DIMENSION_RATIO] = { N_("ratio"), "", "", { "", "", "" }, { 3, 2 } },
  [HL_DIMENSION_PRESSURE] = { N_("pressure"), "Pa", "_Pa", { "bar", "kPa", "psia" }, { 0, 4 } },
  [HL_DIMENSION_PRESSURE_DIFFERENCE] = { N_("pressure difference"), "Pa", "_Pa", { "bar", "kPa", "psi" }, { 0, 4 } },
  [HL_DIMENSION_TEMPERATURE] = { N_("temperature"), "K", "_K", { "°C", "K", "°F" }, { 1, 1 } },
  [HL_DIMENSION_TEMPERATURE_DIFFERENCE] = { N_("temperature difference"), "K", "_K", { "K", "K", "°F" }, { 1, 2 } },
  [HL_DIMENSION_MASS_FLOW] = { N_("mass flow"), "kg/s", "_kg_s", { "kg/s", "kg/s", "klb/h" }, { 2, 3 } },
  [HL_DIMENSION_ENTHALPY] = { N_("specific enthalpy"), "J/kg", "_J_kg", { "kJ/kg", "kJ/kg", "Btu/lb" }, { 1, 1 } },
  [HL_DIMENSION_ENTROPY] = { N_("specific entropy"), "J/(kg K)", "_J_kgK", { "kJ/(kg K)", "kJ/(kg K)", "Btu/(lb °F)" }, { 4, 1 } },
  [HL_DIMENSION_VOLUME] = { N_("specific volume"), "m3/kg", "_m3_kg", { "m³/kg", "m³/kg", "ft³/lb" }, { 0, 5 } },
  [HL_DIMENSION_POWER] = { N_("power"), "W", "_W", { "MW", "kW", "MW" }, { 0, 4 } },
  [HL_DIMENSION_CONDUCTANCE] = { N_("conductance"), "W/K", "_W_K", { "kW/K", "kW/K", "Btu/(h °F)" }, { 0, 4 } },
  [HL_DIMENSION_LENGTH] = { N_("length"), "m", "_m", { "m", "m", "ft" }, { 1, 3 } },
  [HL_DIMENSION_HEAT_RATE] = { N_("heat rate"), "J/J", "_J_J", { "kJ/kWh", "kJ/kWh", "Btu/kWh" }, { 0, 1 } },
  [HL_DIMENSION_STEAM_RATE] = { N_("steam rate"), "kg/J", "_kg_J", { "kg/kWh", "kg/kWh", "lb/kWh" }, { 2, 3 } },
  [HL_DIMENSION_VOLUME_FLOW] = { N_("volume flow"), "m3/s", "_m3_s", { "m³/h", "m³/s", "ft³/min" }, { 0, 4 } },
  [HL_DIMENSION_COUNT] = { N_("number"), "", "", { "", "", "" }, { 0, 6 } },
};

static const char *const set_ids[HL_N_UNIT_SETS] = { "metric", "si", "us" };

const char *
hl_units_label (HlDimension dimension, HlUnitSet set)
{
  g_return_val_if_fail ((guint) dimension < HL_N_DIMENSIONS && (guint) set < HL_N_UNIT_SETS, "");
  return dimensions[dimension].labels[set];
}

/* Factor and offset of a label for this dimension. */
static void
conversion (const char *label, HlDimension dimension, double *factor, double *offset)
{
  const HlUnit *unit, *ambiguous;
  g_autofree char *tidy = NULL;
  *factor = 1.0;
  *offset = 0.0;
  if (*label == '\0')
    return;
  tidy = hl_units_tidy (label);
  unit = hl_unit_find (tidy, strlen (tidy), dimension, &ambiguous);
  g_assert (unit != NULL && ambiguous == NULL);
  *factor = unit->factor;
  *offset = hl_dimension_is_difference (dimension) ? 0.0 : unit->offset;
}

double
hl_units_to_display (double si, HlDimension dimension, HlUnitSet set)
{
  double factor, offset;
  conversion (hl_units_label (dimension, set), dimension, &factor, &offset);
  return (si - offset) / factor;
}

double
hl_units_from_display (double shown, HlDimension dimension, HlUnitSet set)
{
  double factor, offset;
  conversion (hl_units_label (dimension, set), dimension, &factor, &offset);
  return shown * factor + offset;
}

const char *
hl_units_label_of (double si, HlDimension dimension, HlUnitSet set)
{
  double size = fabs (si);
  if (dimension == HL_DIMENSION_POWER && size > 0.0 && size < 1e3)
    return "W";
  if (dimension == HL_DIMENSION_POWER && size > 0.0 && size < 1e6)
    return "kW";
  return hl_units_label (dimension, set);
}

static char *
round_number (double shown, const Rounding *rounding)
{
  char text[64];
  int decimals = rounding->decimals;
  if (!isfinite (shown))
    return g_strdup ("–");
  if (fabs (shown) >= 1e9)
    return g_strdup_printf ("%.6g", shown);
  if (fabs (shown) >= 1e-9)
    decimals = MAX (decimals, rounding->digits - 1 - (int) floor (log10 (fabs (shown))));
  decimals = MIN (decimals, 8);
  g_snprintf (text, sizeof text, "%.*f", decimals, shown);
  /* 9.9996 with four digits becomes 10.0000: one decimal less. */
  if (decimals > rounding->decimals && fabs (shown) >= 1e-9)
    {
      int digits_before = (int) floor (log10 (fabs (g_ascii_strtod (text, NULL))));
      int fewer = MAX (rounding->decimals, rounding->digits - 1 - digits_before);
      if (fewer >= 0 && fewer < decimals && strpbrk (text, "123456789") != NULL)
        g_snprintf (text, sizeof text, "%.*f", fewer, shown);
    }
  if (text[0] == '-' && strpbrk (text, "123456789") == NULL)
    return g_strdup (text + 1);   /* no minus before zero */
  return g_strdup (text);
}

char *
hl_units_format_number (double si, HlDimension dimension, HlUnitSet set)
{
  return round_number (hl_units_to_display (si, dimension, set), &dimensions[dimension].rounding);
}

char *
hl_units_format (double si, HlDimension dimension, HlUnitSet set)
{
  const char *label = hl_units_label_of (si, dimension, set);
  g_autofree char *number = NULL;
  double factor, offset;
  if (!isfinite (si))
    return g_strdup ("–");
  conversion (label, dimension, &factor, &offset);
  number = round_number ((si - offset) / factor, &dimensions[dimension].rounding);
  return *label != '\0' ? g_strdup_printf ("%s %s", number, label) : g_steal_pointer (&number);
}

/* Shortest digits of a number near @shown that come back as exactly @si. */
static char *
exact_digits (double si, double shown, double factor, double offset)
{
  char text[32];
  for (int digits = 1; digits <= 17; digits++)
    {
      double back;
      g_snprintf (text, sizeof text, "%.*g", digits, shown);
      back = g_ascii_strtod (text, NULL) * factor + offset;
      if (!(back < si) && !(back > si))
        return g_strdup (text);
    }
  return NULL;
}

char *
hl_units_format_exact (double si, HlDimension dimension, HlUnitSet set)
{
  const char *label = hl_units_label_of (si, dimension, set);
  g_autofree char *digits = NULL;
  double factor, offset, shown;
  if (!isfinite (si))
    return g_strdup ("–");
  conversion (label, dimension, &factor, &offset);
  shown = (si - offset) / factor;
  digits = exact_digits (si, shown, factor, offset);
  for (int i = 0; i < 4 && digits == NULL; i++)
    {
      /* A division and a multiplication do not always undo each other; a neighbour may. */
      double up = shown, down = shown;
      for (int j = 0; j <= i; j++)
        {
          up = nextafter (up, INFINITY);
          down = nextafter (down, -INFINITY);
        }
      digits = exact_digits (si, up, factor, offset);
      if (digits == NULL)
        digits = exact_digits (si, down, factor, offset);
    }
  if (digits == NULL)
    {
      label = hl_dimension_si_unit (dimension);
      digits = hl_number_to_text (si);
    }
  return *label != '\0' ? g_strdup_printf ("%s %s", digits, label) : g_steal_pointer (&digits);
}

char *
hl_units_format_percent (double ratio)
{
  g_autofree char *digits = exact_digits (ratio, 100.0 * ratio, 0.01, 0.0);
  if (digits != NULL)
    return g_strdup_printf ("%s %%", digits);
  return hl_number_to_text (ratio);
}

char *
hl_number_to_text (double number)
{
  char text[32];
  for (int digits = 15; digits <= 17; digits++)
    {
      double back;
      g_ascii_formatd (text, sizeof text, digits == 15 ? "%.15g" : digits == 16 ? "%.16g" : "%.17g", number);
      back = g_ascii_strtod (text, NULL);
      if (!(back < number) && !(back > number))
        break;
    }
  return g_strdup (text);
}

const char *
hl_dimension_name (HlDimension dimension)
{
  g_return_val_if_fail ((guint) dimension < HL_N_DIMENSIONS, "");
  return _(dimensions[dimension].name);
}

const char *
hl_dimension_si_unit (HlDimension dimension)
{
  g_return_val_if_fail ((guint) dimension < HL_N_DIMENSIONS, "");
  return dimensions[dimension].si_unit;
}

const char *
hl_dimension_json_suffix (HlDimension dimension)
{
  g_return_val_if_fail ((guint) dimension < HL_N_DIMENSIONS, "");
  return dimensions[dimension].json_suffix;
}

const char *
hl_unit_set_id (HlUnitSet set)
{
  g_return_val_if_fail ((guint) set < HL_N_UNIT_SETS, NULL);
  return set_ids[set];
}

gboolean
hl_unit_set_from_id (const char *id, HlUnitSet *set)
{
  g_return_val_if_fail (id != NULL && set != NULL, FALSE);
  for (guint i = 0; i < HL_N_UNIT_SETS; i++)
    if (g_str_equal (set_ids[i], id))
      {
        *set = (HlUnitSet) i;
        return TRUE;
      }
  return FALSE;
}

double
hl_site_pressure (double altitude)
{
  /* ISO 2533, troposphere. */
  return 101325.0 * pow (1.0 - 2.25577e-5 * altitude, 5.25588);
}
