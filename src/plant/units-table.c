/* Every unit that may be typed: one row each.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "plant/units-private.h"
#include "plant/i18n.h"
#include <float.h>
#include <math.h>
#include <stdlib.h>
#include <string.h>

/* NIST Special Publication 811 (2008), appendix B: exact are lb 0.45359237 kg, ft 0.3048 m, atm 101325 Pa, bar 1e5 Pa,
 * kgf/cm2 98066.5 Pa, metric horsepower 735.49875 W.  International table calorie: 1 Btu/lb = 2326 J/kg and
 * 1 kcal/kg = 4186.8 J/kg (International Conference on the Properties of Steam, 1956).  Mercury: conventional inch
 * 3386.389 Pa, conventional millimetre 133.3224 Pa.  The rest follows from these. */
#define LB      0.45359237
#define FT      0.3048
#define GALLON  (231.0 * FT / 12.0 * FT / 12.0 * FT / 12.0)
#define LBF     (LB * 9.80665)
#define PSI     (LBF / (FT / 12.0 * FT / 12.0))
#define BTU     (2326.0 * LB)
#define KCAL    4186.8
#define HOUR    3600.0
#define KWH     3.6e6
#define INHG    3386.389
#define MMHG    133.3224
#define FAHRENHEIT_ZERO (459.67 * 5.0 / 9.0)

#define VACUUM_REASON N_("a vacuum counts down from an ambient pressure that is not said; write the absolute pressure, for instance 2 inHg abs or 68 mbar")
#define MBTU_REASON   N_("M before Btu means thousand for some and million for others; write MMBtu/h or Btu/h")
#define MLB_REASON    N_("M before lb means thousand for some and million for others; write klb/h or lb/h")

#define PLAIN(text, dimension, factor)          { text, HL_DIMENSION_##dimension, factor, 0.0, HL_UNIT_PLAIN, NULL }
#define OFFSET(text, dimension, factor, offset) { text, HL_DIMENSION_##dimension, factor, offset, HL_UNIT_PLAIN, NULL }
#define GAUGE(text, factor)                     { text, HL_DIMENSION_PRESSURE, factor, 0.0, HL_UNIT_GAUGE, NULL }
#define ABSOLUTE(text, factor)                  { text, HL_DIMENSION_PRESSURE, factor, 0.0, HL_UNIT_ABSOLUTE, NULL }
#define REFUSED(text, dimension, why)           { text, HL_DIMENSION_##dimension, 0.0, 0.0, HL_UNIT_REFUSED, why }

/* Within a dimension the usual ones first: messages name the first few. */
static const HlUnit units[] = {
  PLAIN ("%", RATIO, 0.01), PLAIN ("percent", RATIO, 0.01), PLAIN ("‰", RATIO, 0.001), PLAIN ("kg/kg", RATIO, 1.0),

  PLAIN ("bar", PRESSURE, 1e5), GAUGE ("barg", 1e5), ABSOLUTE ("bara", 1e5), PLAIN ("mbar", PRESSURE, 100.0),
  PLAIN ("kPa", PRESSURE, 1e3), PLAIN ("MPa", PRESSURE, 1e6), PLAIN ("Pa", PRESSURE, 1.0),
  PLAIN ("psi", PRESSURE, PSI), ABSOLUTE ("psia", PSI), GAUGE ("psig", PSI), PLAIN ("inHg", PRESSURE, INHG),
  PLAIN ("kgf/cm2", PRESSURE, 98066.5), PLAIN ("atm", PRESSURE, 101325.0), PLAIN ("mmHg", PRESSURE, MMHG),
  PLAIN ("hPa", PRESSURE, 100.0), ABSOLUTE ("mbara", 100.0), GAUGE ("mbarg", 100.0), ABSOLUTE ("kPaa", 1e3), GAUGE ("kPag", 1e3),
  ABSOLUTE ("MPaa", 1e6), GAUGE ("MPag", 1e6), ABSOLUTE ("inHga", INHG), ABSOLUTE ("inHgabs", INHG), ABSOLUTE ("mmHga", MMHG),
  ABSOLUTE ("mmHgabs", MMHG), PLAIN ("Torr", PRESSURE, 101325.0 / 760.0), ABSOLUTE ("kgf/cm2a", 98066.5), GAUGE ("kgf/cm2g", 98066.5),
  PLAIN ("kg/cm2", PRESSURE, 98066.5), ABSOLUTE ("kg/cm2a", 98066.5), GAUGE ("kg/cm2g", 98066.5), PLAIN ("at", PRESSURE, 98066.5),
  ABSOLUTE ("ata", 98066.5), ABSOLUTE ("barabs", 1e5), ABSOLUTE ("psiabs", PSI), PLAIN ("mmH2O", PRESSURE, 9.80665),
  PLAIN ("N/m2", PRESSURE, 1.0),
  REFUSED ("inHgvac", PRESSURE, VACUUM_REASON), REFUSED ("inHgvacuum", PRESSURE, VACUUM_REASON), REFUSED ("inHgv", PRESSURE, VACUUM_REASON),
  REFUSED ("mmHgvac", PRESSURE, VACUUM_REASON), REFUSED ("mmHgvacuum", PRESSURE, VACUUM_REASON), REFUSED ("barvac", PRESSURE, VACUUM_REASON),
  REFUSED ("mbarvac", PRESSURE, VACUUM_REASON), REFUSED ("mbarvacuum", PRESSURE, VACUUM_REASON),
  REFUSED ("mPa", PRESSURE, N_("that is a thousandth of a pascal; write MPa for a million pascals")),
  REFUSED ("Mbar", PRESSURE, N_("that is a million bar; write mbar for a thousandth of a bar")),

  OFFSET ("°C", TEMPERATURE, 1.0, 273.15), PLAIN ("K", TEMPERATURE, 1.0), OFFSET ("°F", TEMPERATURE, 5.0 / 9.0, FAHRENHEIT_ZERO),
  PLAIN ("°R", TEMPERATURE, 5.0 / 9.0), OFFSET ("degC", TEMPERATURE, 1.0, 273.15), OFFSET ("degF", TEMPERATURE, 5.0 / 9.0, FAHRENHEIT_ZERO),

  PLAIN ("kg/s", MASS_FLOW, 1.0), PLAIN ("t/h", MASS_FLOW, 1e3 / HOUR), PLAIN ("kg/h", MASS_FLOW, 1.0 / HOUR),
  PLAIN ("lb/h", MASS_FLOW, LB / HOUR), PLAIN ("klb/h", MASS_FLOW, 1e3 * LB / HOUR), PLAIN ("lb/s", MASS_FLOW, LB),
  PLAIN ("g/s", MASS_FLOW, 1e-3), PLAIN ("kg/min", MASS_FLOW, 1.0 / 60.0), PLAIN ("t/d", MASS_FLOW, 1e3 / (24.0 * HOUR)),
  PLAIN ("lbm/h", MASS_FLOW, LB / HOUR), PLAIN ("lb/hr", MASS_FLOW, LB / HOUR), PLAIN ("klb/hr", MASS_FLOW, 1e3 * LB / HOUR),
  PLAIN ("kg/hr", MASS_FLOW, 1.0 / HOUR), PLAIN ("t/hr", MASS_FLOW, 1e3 / HOUR), PLAIN ("lb/min", MASS_FLOW, LB / 60.0),
  PLAIN ("t/s", MASS_FLOW, 1e3),
  REFUSED ("Mlb/h", MASS_FLOW, MLB_REASON), REFUSED ("Mlb/hr", MASS_FLOW, MLB_REASON),

  PLAIN ("kJ/kg", ENTHALPY, 1e3), PLAIN ("J/kg", ENTHALPY, 1.0), PLAIN ("MJ/kg", ENTHALPY, 1e6), PLAIN ("Btu/lb", ENTHALPY, 2326.0),
  PLAIN ("kcal/kg", ENTHALPY, KCAL), PLAIN ("J/g", ENTHALPY, 1e3), PLAIN ("kWh/kg", ENTHALPY, KWH), PLAIN ("Btu/lbm", ENTHALPY, 2326.0),
  PLAIN ("GJ/t", ENTHALPY, 1e6), PLAIN ("MWh/t", ENTHALPY, KWH),

  PLAIN ("kJ/(kg K)", ENTROPY, 1e3), PLAIN ("J/(kg K)", ENTROPY, 1.0), PLAIN ("Btu/(lb °F)", ENTROPY, KCAL),
  PLAIN ("kcal/(kg K)", ENTROPY, KCAL), PLAIN ("kJ/(kg °C)", ENTROPY, 1e3), PLAIN ("J/(kg °C)", ENTROPY, 1.0),
  PLAIN ("Btu/(lb °R)", ENTROPY, KCAL), PLAIN ("Btu/(lbm °R)", ENTROPY, KCAL), PLAIN ("Btu/(lbm °F)", ENTROPY, KCAL),
  PLAIN ("kcal/(kg °C)", ENTROPY, KCAL), PLAIN ("kJ/kg/K", ENTROPY, 1e3), PLAIN ("J/kg/K", ENTROPY, 1.0), PLAIN ("J/(g K)", ENTROPY, 1e3),

  PLAIN ("m3/kg", VOLUME, 1.0), PLAIN ("ft3/lb", VOLUME, FT * FT * FT / LB), PLAIN ("l/kg", VOLUME, 1e-3),
  PLAIN ("dm3/kg", VOLUME, 1e-3), PLAIN ("cm3/g", VOLUME, 1e-3), PLAIN ("ft3/lbm", VOLUME, FT * FT * FT / LB),

  PLAIN ("MW", POWER, 1e6), PLAIN ("kW", POWER, 1e3), PLAIN ("W", POWER, 1.0), PLAIN ("MMBtu/h", POWER, 1e6 * BTU / HOUR),
  PLAIN ("Btu/h", POWER, BTU / HOUR), PLAIN ("hp", POWER, 550.0 * FT * LBF), PLAIN ("GW", POWER, 1e9),
  PLAIN ("PS", POWER, 735.49875), PLAIN ("MWe", POWER, 1e6), PLAIN ("MWel", POWER, 1e6), PLAIN ("MWth", POWER, 1e6),
  PLAIN ("kWe", POWER, 1e3), PLAIN ("kWel", POWER, 1e3), PLAIN ("kWth", POWER, 1e3), PLAIN ("kJ/s", POWER, 1e3),
  PLAIN ("MJ/s", POWER, 1e6), PLAIN ("J/s", POWER, 1.0), PLAIN ("kJ/h", POWER, 1e3 / HOUR), PLAIN ("MJ/h", POWER, 1e6 / HOUR),
  PLAIN ("GJ/h", POWER, 1e9 / HOUR), PLAIN ("kcal/h", POWER, KCAL / HOUR), PLAIN ("Mcal/h", POWER, 1e3 * KCAL / HOUR),
  PLAIN ("Gcal/h", POWER, 1e6 * KCAL / HOUR), PLAIN ("Btu/hr", POWER, BTU / HOUR), PLAIN ("MMBtu/hr", POWER, 1e6 * BTU / HOUR),
  PLAIN ("Btu/s", POWER, BTU), PLAIN ("kBtu/h", POWER, 1e3 * BTU / HOUR),
  REFUSED ("mW", POWER, N_("that is a thousandth of a watt; write MW for a million watts")),
  REFUSED ("MBtu/h", POWER, MBTU_REASON), REFUSED ("MBtu/hr", POWER, MBTU_REASON),

  PLAIN ("kW/K", CONDUCTANCE, 1e3), PLAIN ("W/K", CONDUCTANCE, 1.0), PLAIN ("MW/K", CONDUCTANCE, 1e6),
  PLAIN ("Btu/(h °F)", CONDUCTANCE, BTU / HOUR * 9.0 / 5.0), PLAIN ("W/°C", CONDUCTANCE, 1.0), PLAIN ("kW/°C", CONDUCTANCE, 1e3),
  PLAIN ("Btu/(hr °F)", CONDUCTANCE, BTU / HOUR * 9.0 / 5.0), PLAIN ("kcal/(h K)", CONDUCTANCE, KCAL / HOUR),
  REFUSED ("mW/K", CONDUCTANCE, N_("that is a thousandth of a watt per kelvin; write MW/K for a million")),

  PLAIN ("m", LENGTH, 1.0), PLAIN ("ft", LENGTH, FT), PLAIN ("mm", LENGTH, 1e-3), PLAIN ("cm", LENGTH, 1e-2), PLAIN ("km", LENGTH, 1e3),
  PLAIN ("in", LENGTH, FT / 12.0), PLAIN ("inch", LENGTH, FT / 12.0),

  PLAIN ("cm2", AREA, 1e-4), PLAIN ("m2", AREA, 1.0), PLAIN ("mm2", AREA, 1e-6), PLAIN ("in2", AREA, FT / 12.0 * FT / 12.0), PLAIN ("ft2", AREA, FT * FT), PLAIN ("ha", AREA, 1e4),

  PLAIN ("kJ/kWh", HEAT_RATE, 1e3 / KWH), PLAIN ("Btu/kWh", HEAT_RATE, BTU / KWH), PLAIN ("kcal/kWh", HEAT_RATE, KCAL / KWH),
  PLAIN ("J/J", HEAT_RATE, 1.0), PLAIN ("MJ/kWh", HEAT_RATE, 1e6 / KWH), PLAIN ("GJ/MWh", HEAT_RATE, 1e9 / (1e3 * KWH)),
  PLAIN ("kW/kW", HEAT_RATE, 1.0), PLAIN ("kJ/kJ", HEAT_RATE, 1.0),

  PLAIN ("kg/kWh", STEAM_RATE, 1.0 / KWH), PLAIN ("lb/kWh", STEAM_RATE, LB / KWH), PLAIN ("t/MWh", STEAM_RATE, 1.0 / KWH),
  PLAIN ("kg/J", STEAM_RATE, 1.0), PLAIN ("kg/MWh", STEAM_RATE, 1e-3 / KWH), PLAIN ("kg/MJ", STEAM_RATE, 1e-6),
  PLAIN ("kg/GJ", STEAM_RATE, 1e-9), PLAIN ("g/kWh", STEAM_RATE, 1e-3 / KWH), PLAIN ("lb/MMBtu", STEAM_RATE, LB / (1e6 * BTU)),
  PLAIN ("lb/MWh", STEAM_RATE, LB / (1e3 * KWH)), PLAIN ("t/TJ", STEAM_RATE, 1e-9),

  PLAIN ("W/m2", IRRADIANCE, 1.0), PLAIN ("kW/m2", IRRADIANCE, 1e3), PLAIN ("Btu/(h ft2)", IRRADIANCE, BTU / HOUR / (FT * FT)),

  PLAIN ("m3/h", VOLUME_FLOW, 1.0 / HOUR), PLAIN ("m3/s", VOLUME_FLOW, 1.0), PLAIN ("ft3/min", VOLUME_FLOW, FT * FT * FT / 60.0),
  PLAIN ("ft3/s", VOLUME_FLOW, FT * FT * FT), PLAIN ("gpm", VOLUME_FLOW, GALLON / 60.0), PLAIN ("l/s", VOLUME_FLOW, 1e-3),
  PLAIN ("l/min", VOLUME_FLOW, 1e-3 / 60.0), PLAIN ("m3/hr", VOLUME_FLOW, 1.0 / HOUR), PLAIN ("m3/min", VOLUME_FLOW, 1.0 / 60.0),
};

/* Letters that carry the meaning: spaces, brackets, dots and degree signs go. */
static gboolean
bare_spelling (const char *text, gsize length, char bare[32])
{
  gsize n = 0;
  for (gsize i = 0; i < length; i++)
    {
      if (strchr (" ()^", text[i]) != NULL)
        continue;
      if (i + 1 < length && (memcmp (text + i, "°", 2) == 0 || memcmp (text + i, "·", 2) == 0))
        {
          i++;
          continue;
        }
      if (n + 1 >= 32)
        return FALSE;
      bare[n++] = text[i];
    }
  bare[n] = '\0';
  return n > 0;
}

/* The spellings of the table, made once. */
static gpointer
build_spellings (G_GNUC_UNUSED gpointer data)
{
  char (*spellings)[32] = g_malloc0 (G_N_ELEMENTS (units) * sizeof *spellings);
  for (guint i = 0; i < G_N_ELEMENTS (units); i++)
    if (!bare_spelling (units[i].text, strlen (units[i].text), spellings[i]))
      g_assert_not_reached ();
  return spellings;
}

static gboolean
row_spells (guint row, const char *bare, gboolean mind_case)
{
  static GOnce once = G_ONCE_INIT;
  char (*spellings)[32] = g_once (&once, build_spellings, NULL);
  return mind_case ? strcmp (spellings[row], bare) == 0 : g_ascii_strcasecmp (spellings[row], bare) == 0;
}

/* First row that fits; @other: one that fits too but means something else. */
static const HlUnit *
search (const char *bare, gboolean mind_case, gboolean any_dimension, HlDimension dimension, const HlUnit **other)
{
  const HlUnit *found = NULL;
  *other = NULL;
  for (guint i = 0; i < G_N_ELEMENTS (units); i++)
    {
      const HlUnit *unit = &units[i];
      if ((!any_dimension && unit->dimension != dimension) || !row_spells (i, bare, mind_case))
        continue;
      if (found == NULL)
        found = unit;
      else if (unit->dimension == found->dimension && (unit->nature != found->nature || unit->factor < found->factor
                                                       || unit->factor > found->factor))
        *other = unit;
    }
  return found;
}

const HlUnit *
hl_unit_find (const char *text, gsize length, HlDimension dimension, const HlUnit **ambiguous)
{
  char bare[32];
  const HlUnit *found = NULL;
  *ambiguous = NULL;
  dimension = hl_unit_dimension (dimension);
  if (!bare_spelling (text, length, bare))
    return NULL;
  for (int any = 0; any <= 1 && found == NULL; any++)
    for (int fold = 0; fold <= 1 && found == NULL; fold++)
      found = search (bare, fold == 0, any == 1, dimension, ambiguous);
  return found;
}

/* k of a factor that is the power of ten 10^k, within what a double can tell; 0: it is none, or 1. */
static int
power_of_ten (double factor)
{
  int k = (int) rint (log10 (factor));
  double power = pow (10.0, abs (k));
  if (k >= 1 && k <= 9)
    return fabs (factor - power) > 0.0 ? 0 : k;
  if (k <= -1 && k >= -9)
    return fabs (factor - 1.0 / power) > 0.0 ? 0 : k;
  return 0;
}

/* Moves the decimal point, so that 0.07 bar is 7000 Pa and 83 % is 0.83: the product of two rounded doubles is often
 * a neighbour of these.  Numbers with more than 15 digits did not come from a person and are multiplied. */
static gboolean
shift_point (double number, int k, double *shifted)
{
  char text[40], *e;
  g_ascii_formatd (text, sizeof text, "%.14e", number);
  if (fabs (g_ascii_strtod (text, NULL) - number) > 0.0)
    return FALSE;
  e = strchr (text, 'e');
  k += (int) g_ascii_strtoll (e + 1, NULL, 10);
  g_snprintf (e, sizeof text - (gsize) (e - text), "e%d", k);
  *shifted = g_ascii_strtod (text, NULL);
  return TRUE;
}

double
hl_multiply_exactly (double number, double factor)
{
  int k = power_of_ten (factor);
  double shifted;
  return k != 0 && isfinite (number) && shift_point (number, k, &shifted) ? shifted : number * factor;
}

double
hl_divide_exactly (double number, double factor)
{
  int k = power_of_ten (factor);
  double shifted;
  return k != 0 && isfinite (number) && shift_point (number, -k, &shifted) ? shifted : number / factor;
}

double
hl_add_exactly (double number, double offset)
{
  double sum = number + offset, neat;
  char text[40];
  if (!(fabs (offset) > 0.0) || !isfinite (sum))
    return sum;
  g_ascii_formatd (text, sizeof text, "%.15g", sum);
  neat = g_ascii_strtod (text, NULL);
  return fabs (neat - sum) <= 2.0 * DBL_EPSILON * fabs (sum) ? neat : sum;
}

gboolean
hl_dimension_is_difference (HlDimension dimension)
{
  return dimension == HL_DIMENSION_PRESSURE_DIFFERENCE || dimension == HL_DIMENSION_TEMPERATURE_DIFFERENCE;
}

HlDimension
hl_unit_dimension (HlDimension dimension)
{
  switch (dimension)
    {
    case HL_DIMENSION_PRESSURE_DIFFERENCE:
      return HL_DIMENSION_PRESSURE;
    case HL_DIMENSION_TEMPERATURE_DIFFERENCE:
      return HL_DIMENSION_TEMPERATURE;
    case HL_DIMENSION_APERTURE:
      return HL_DIMENSION_AREA;
    case HL_DIMENSION_EMISSION:
      return HL_DIMENSION_STEAM_RATE;
    default:
      return dimension;
    }
}

char *
hl_unit_suggestions (HlDimension dimension)
{
  GString *text = g_string_new (NULL);
  guint n = 0;
  if (dimension == HL_DIMENSION_COUNT)
    g_string_append (text, _("a plain number"));
  for (guint i = 0; i < G_N_ELEMENTS (units) && n < 8; i++)
    {
      const HlUnit *unit = &units[i];
      if (unit->dimension != hl_unit_dimension (dimension) || unit->nature == HL_UNIT_REFUSED
          || (hl_dimension_is_difference (dimension) && unit->nature != HL_UNIT_PLAIN)
          || (dimension == HL_DIMENSION_RATIO && n >= 1))
        continue;
      g_string_append_printf (text, "%s%s", n > 0 ? ", " : "", unit->text);
      n++;
    }
  return g_string_free (text, FALSE);
}
