/* Dimensions and unit sets: what is shown, and how it is rounded.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "plant/units-private.h"
#include "plant/i18n.h"
#include <math.h>
#include <string.h>

/* Rounding (common practice, no source): p 4 digits, T 0.1 K, h 0.1 kJ/kg, m 0.01 kg/s, x 0.001, power 0.1 %, heat rate 1.
 * At least @decimals decimals and at least @digits significant digits, so that small values stay readable; 0 digits: no
 * matter how small. */
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
  [HL_DIMENSION_TEMPERATURE] = { N_("temperature"), "K", "_K", { "°C", "K", "°F" }, { 1, 0 } },
  [HL_DIMENSION_TEMPERATURE_DIFFERENCE] = { N_("temperature difference"), "K", "_K", { "K", "K", "°F" }, { 1, 2 } },
  [HL_DIMENSION_MASS_FLOW] = { N_("mass flow"), "kg/s", "_kg_s", { "kg/s", "kg/s", "klb/h" }, { 2, 3 } },
  [HL_DIMENSION_ENTHALPY] = { N_("specific enthalpy"), "J/kg", "_J_kg", { "kJ/kg", "kJ/kg", "Btu/lb" }, { 1, 0 } },
  [HL_DIMENSION_ENTROPY] = { N_("specific entropy"), "J/(kg K)", "_J_kgK", { "kJ/(kg K)", "kJ/(kg K)", "Btu/(lb °F)" }, { 4, 0 } },
  [HL_DIMENSION_VOLUME] = { N_("specific volume"), "m3/kg", "_m3_kg", { "m³/kg", "m³/kg", "ft³/lb" }, { 0, 5 } },
  [HL_DIMENSION_POWER] = { N_("power"), "W", "_W", { "MW", "kW", "MW" }, { 0, 4 } },
  [HL_DIMENSION_CONDUCTANCE] = { N_("conductance"), "W/K", "_W_K", { "kW/K", "kW/K", "Btu/(h °F)" }, { 0, 4 } },
  [HL_DIMENSION_LENGTH] = { N_("length"), "m", "_m", { "m", "m", "ft" }, { 1, 3 } },
  [HL_DIMENSION_HEAT_RATE] = { N_("heat rate"), "J/J", "_J_J", { "kJ/kWh", "kJ/kWh", "Btu/kWh" }, { 0, 0 } },
  [HL_DIMENSION_STEAM_RATE] = { N_("steam rate"), "kg/J", "_kg_J", { "kg/kWh", "kg/kWh", "lb/kWh" }, { 2, 3 } },
  [HL_DIMENSION_VOLUME_FLOW] = { N_("volume flow"), "m3/s", "_m3_s", { "m³/h", "m³/s", "ft³/min" }, { 0, 4 } },
  [HL_DIMENSION_EMISSION] = { N_("emission"), "kg/J", "_kg_J", { "kg/MWh", "kg/MWh", "lb/MWh" }, { 1, 4 } },
  [HL_DIMENSION_AREA] = { N_("area"), "m2", "_m2", { "cm²", "m²", "in²" }, { 0, 4 } },
  [HL_DIMENSION_APERTURE] = { N_("aperture area"), "m2", "_m2", { "m²", "m²", "ft²" }, { 0, 4 } },
  [HL_DIMENSION_IRRADIANCE] = { N_("irradiance"), "W/m2", "_W_m2", { "W/m²", "W/m²", "W/m²" }, { 0, 3 } },
  [HL_DIMENSION_COUNT] = { N_("number"), "", "", { "", "", "" }, { 0, 6 } },
};

static const char *const set_ids[HL_N_UNIT_SETS] = { "metric", "si", "us" };

const char *
hl_units_label (HlDimension dimension, HlUnitSet set)
{
  g_return_val_if_fail ((guint) dimension < HL_N_DIMENSIONS && (guint) set < HL_N_UNIT_SETS, "");
  return dimensions[dimension].labels[set];
}

typedef struct { double factor, offset; } Conversion;

/* The labels looked up once: formatting a ledger must not search the table of units for every number. */
static gpointer
build_conversions (G_GNUC_UNUSED gpointer data)
{
  Conversion *all = g_new0 (Conversion, HL_N_DIMENSIONS * HL_N_UNIT_SETS);
  for (int d = 0; d < HL_N_DIMENSIONS; d++)
    for (int set = 0; set < HL_N_UNIT_SETS; set++)
      {
        Conversion *conversion = &all[d * HL_N_UNIT_SETS + set];
        g_autofree char *tidy = hl_units_tidy (dimensions[d].labels[set]);
        const HlUnit *unit, *ambiguous;
        *conversion = (Conversion) { 1.0, 0.0 };
        if (*tidy == '\0')
          continue;
        unit = hl_unit_find (tidy, strlen (tidy), (HlDimension) d, &ambiguous);
        g_assert (unit != NULL && ambiguous == NULL);
        *conversion = (Conversion) { unit->factor, hl_dimension_is_difference ((HlDimension) d) ? 0.0 : unit->offset };
      }
  return all;
}

static Conversion
conversion_of_set (HlDimension dimension, HlUnitSet set)
{
  static GOnce once = G_ONCE_INIT;
  const Conversion *all = g_once (&once, build_conversions, NULL);
  return all[(int) dimension * HL_N_UNIT_SETS + (int) set];
}

/* The smaller unit in which a small power is shown with its unit; NULL: the one of the set. */
static const char *
small_power_label (double si, HlDimension dimension, Conversion *conversion)
{
  double size = fabs (si);
  if (dimension != HL_DIMENSION_POWER || !(size > 0.0 && size < 1e6))
    return NULL;
  *conversion = (Conversion) { size < 1e3 ? 1.0 : 1e3, 0.0 };
  return size < 1e3 ? "W" : "kW";
}

/* Label and conversion of a value that is shown with its unit. */
static const char *
choose_label (double si, HlDimension dimension, HlUnitSet set, Conversion *conversion)
{
  const char *small = small_power_label (si, dimension, conversion);
  if (small != NULL)
    return small;
  *conversion = conversion_of_set (dimension, set);
  return hl_units_label (dimension, set);
}

double
hl_units_to_display (double si, HlDimension dimension, HlUnitSet set)
{
  Conversion conversion = conversion_of_set (dimension, set);
  return (si - conversion.offset) / conversion.factor;
}

double
hl_units_from_display (double shown, HlDimension dimension, HlUnitSet set)
{
  Conversion conversion = conversion_of_set (dimension, set);
  return hl_add_exactly (hl_multiply_exactly (shown, conversion.factor), conversion.offset);
}

const char *
hl_units_label_of (double si, HlDimension dimension, HlUnitSet set)
{
  Conversion conversion;
  return choose_label (si, dimension, set, &conversion);
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
  if (rounding->digits > 0 && fabs (shown) >= 1e-9)
    decimals = MAX (decimals, rounding->digits - 1 - (int) floor (log10 (fabs (shown))));
  decimals = MIN (decimals, 8);
  g_snprintf (text, sizeof text, "%.*f", decimals, shown);
  /* 9.9996 with four digits becomes 10.0000: one decimal less. */
  if (decimals > rounding->decimals && fabs (shown) >= 1e-9 && strpbrk (text, "123456789") != NULL)
    {
      int digits_before = (int) floor (log10 (fabs (g_ascii_strtod (text, NULL))));
      int fewer = MAX (rounding->decimals, rounding->digits - 1 - digits_before);
      if (fewer >= 0 && fewer < decimals)
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
  Conversion conversion;
  const char *label = choose_label (si, dimension, set, &conversion);
  g_autofree char *number = NULL;
  if (!isfinite (si))
    return g_strdup ("–");
  number = round_number ((si - conversion.offset) / conversion.factor, &dimensions[dimension].rounding);
  return *label != '\0' ? g_strdup_printf ("%s %s", number, label) : g_steal_pointer (&number);
}

/* Shortest text of a number near @shown that comes back as exactly @si; NULL where none does. */
static char *
exact_digits (double si, double shown, const Conversion *conversion)
{
  char text[32];
  for (int digits = 1; digits <= 17; digits++)
    {
      double number, back;
      g_snprintf (text, sizeof text, "%.*g", digits, shown);
      number = g_ascii_strtod (text, NULL);
      back = hl_add_exactly (hl_multiply_exactly (number, conversion->factor), conversion->offset);
      if (!(back < si) && !(back > si))
        return hl_number_to_text (number);
    }
  return NULL;
}

/* A division and a multiplication do not always undo each other; then a neighbour of the quotient may. */
static char *
exact_text (double si, const Conversion *conversion)
{
  double shown = hl_divide_exactly (hl_add_exactly (si, -conversion->offset), conversion->factor), up = shown, down = shown;
  char *text = exact_digits (si, shown, conversion);
  for (int i = 0; i < 4 && text == NULL; i++)
    {
      up = nextafter (up, INFINITY);
      down = nextafter (down, -INFINITY);
      text = exact_digits (si, up, conversion);
      if (text == NULL)
        text = exact_digits (si, down, conversion);
    }
  return text;
}

char *
hl_units_format_exact (double si, HlDimension dimension, HlUnitSet set)
{
  Conversion conversion;
  const char *label = choose_label (si, dimension, set, &conversion);
  g_autofree char *digits = NULL;
  if (!isfinite (si))
    return g_strdup ("–");
  digits = exact_text (si, &conversion);
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
  const Conversion percent = { 0.01, 0.0 };
  g_autofree char *digits = NULL;
  if (!isfinite (ratio))
    return g_strdup ("–");
  digits = exact_text (ratio, &percent);
  return digits != NULL ? g_strdup_printf ("%s %%", digits) : hl_number_to_text (ratio);
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
