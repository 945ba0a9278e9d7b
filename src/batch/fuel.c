/* heatloom-batch fuel: heating values of a fuel, the air it needs, its flue gas; or the list of fuels.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include <math.h>
#include <stdio.h>
#include "batch/command.h"
#include "batch/json-text.h"
#include "draw/export.h"
#include "fluid/combustion.h"
#include "fluid/gas.h"
#include "fluid/humid-air.h"
#include "plant/i18n.h"
#include "plant/units.h"

#define SO3_SHARE 0.02                /* of the sulphur; common practice 0.01 to 0.05, no source */

typedef struct {
  HlFuel         fuel;
  const HlFluid *air;
  double         p, T_air, humidity_ratio;
  HlCombustion   combustion;
  HlState        flame;               /* T is NaN where it lies beyond the gas's range */
  double         T_dew, T_acid;       /* NaN where there is none */
} Burnt;

static gboolean
read_option (const HlArguments *arguments, const char *name, HlDimension dimension, double *value, GError **error)
{
  const char *text = hl_arguments_value (arguments, name);
  if (text == NULL || hl_units_parse (text, dimension, HL_UNITS_METRIC, hl_site_pressure (0.0), value, error))
    return TRUE;
  g_prefix_error (error, "--%s %s: ", name, text);
  return FALSE;
}

static gboolean
read_air (const HlArguments *arguments, Burnt *burnt, GError **error)
{
  double humidity = 0.0;
  HlHumidAir air;
  burnt->p = hl_site_pressure (0.0);
  burnt->T_air = 298.15;
  if (!read_option (arguments, "air", HL_DIMENSION_TEMPERATURE, &burnt->T_air, error)
      || !read_option (arguments, "humidity", HL_DIMENSION_RATIO, &humidity, error)
      || !read_option (arguments, "pressure", HL_DIMENSION_PRESSURE, &burnt->p, error))
    return FALSE;
  burnt->air = hl_fluid_lookup ("air");
  if (hl_arguments_value (arguments, "humidity") == NULL)
    return TRUE;
  if (hl_humid_air_by_relative_humidity (burnt->p, burnt->T_air, humidity, &air) != HL_OK)
    {
      g_set_error (error, HL_BATCH_ERROR, HL_BATCH_ERROR_USAGE,
                   _("--humidity %s: a relative humidity lies between 0 and 100 %%, and the air below the boiling point of water"), hl_arguments_value (arguments, "humidity"));
      return FALSE;
    }
  burnt->humidity_ratio = air.humidity_ratio;
  burnt->air = hl_humid_air_gas (air.humidity_ratio, error);
  return burnt->air != NULL;
}

static gboolean
read_excess (const HlArguments *arguments, const Burnt *burnt, double *excess, GError **error)
{
  double oxygen;
  *excess = 0.0;
  if (hl_arguments_value (arguments, "oxygen") == NULL)
    return read_option (arguments, "excess-air", HL_DIMENSION_RATIO, excess, error);
  if (hl_arguments_value (arguments, "excess-air") != NULL)
    {
      g_set_error (error, HL_BATCH_ERROR, HL_BATCH_ERROR_USAGE, _("--oxygen and --excess-air say the same; give one of them"));
      return FALSE;
    }
  return read_option (arguments, "oxygen", HL_DIMENSION_RATIO, &oxygen, error)
         && hl_combustion_excess_of_oxygen (&burnt->fuel, burnt->air, oxygen, excess, error);
}

static gboolean
burn (const HlArguments *arguments, Burnt *burnt, GError **error)
{
  double moisture = NAN, excess;
  if (!hl_fuel_find (hl_arguments_word (arguments, 0), &burnt->fuel, error) || !read_option (arguments, "moisture", HL_DIMENSION_RATIO, &moisture, error)
      || (!isnan (moisture) && !hl_fuel_with_moisture (&burnt->fuel, moisture, &burnt->fuel, error))
      || !read_air (arguments, burnt, error) || !read_excess (arguments, burnt, &excess, error)
      || !hl_combustion (&burnt->fuel, burnt->air, excess, &burnt->combustion, error))
    return FALSE;
  if (hl_combustion_flame (&burnt->fuel, burnt->air, &burnt->combustion, burnt->p, burnt->T_air, &burnt->flame) != HL_OK)
    burnt->flame.T = NAN;
  burnt->T_dew = hl_gas_water_dew_point (burnt->combustion.gas, burnt->p);
  burnt->T_acid = hl_gas_acid_dew_point (burnt->combustion.gas, burnt->p, SO3_SHARE);
  return TRUE;
}

static G_GNUC_PRINTF (2, 3) void
print_row (const char *name, const char *format, ...)
{
  va_list args;
  va_start (args, format);
  g_autofree char *text = g_strdup_vprintf (format, args);
  va_end (args);
  printf ("  %s%*s%s\n", name, (int) MAX (1, 32 - g_utf8_strlen (name, -1)), "", text);
}

static void
print_temperature (const char *name, double T)
{
  g_autofree char *text = hl_units_format (T, HL_DIMENSION_TEMPERATURE, HL_UNITS_METRIC);
  if (isfinite (T))
    print_row (name, "%s", text);
}

static void
print_analysis (const HlFuel *fuel)
{
  const struct { const char *name; double share; } parts[] = {
    { "C", fuel->carbon }, { "H", fuel->hydrogen }, { "O", fuel->oxygen }, { "N", fuel->nitrogen }, { "S", fuel->sulphur }, { "Cl", fuel->chlorine },
    { _("water"), fuel->moisture }, { _("ash"), fuel->ash },
  };
  g_autoptr (GString) text = g_string_new (NULL);
  for (gsize i = 0; i < G_N_ELEMENTS (parts); i++)
    if (parts[i].share > 0.0)
      g_string_append_printf (text, "%s%s %.2f %%", text->len > 0 ? ", " : "", parts[i].name, 1e2 * parts[i].share);
  print_row (_("Analysis by mass"), "%s", text->str);
}

static void
print_gas (const HlFluid *gas)
{
  g_autofree double *moles = g_new (double, hl_gas_n_species ());
  g_autoptr (GString) text = g_string_new (NULL);
  hl_gas_moles (gas, moles);
  for (guint i = 0; i < hl_gas_n_species (); i++)
    if (moles[i] > 5e-6)
      g_string_append_printf (text, "%s%s %.*f %%", text->len > 0 ? ", " : "", hl_gas_species_formula (i), moles[i] < 1e-3 ? 4 : 2, 1e2 * moles[i]);
  print_row (_("Flue gas by volume"), "%s", text->str);
  print_row (_("Medium"), "%s", hl_fluid_id (gas));
}

static void
print_burnt (const Burnt *burnt)
{
  const HlFuel *fuel = &burnt->fuel;
  const HlCombustion *combustion = &burnt->combustion;
  printf ("%s\n", fuel->name);
  print_row (_("Lower heating value"), "%.2f MJ/kg%s", fuel->lhv / 1e6, fuel->is_lhv_estimated ? _(" (estimated from the analysis)") : "");
  print_row (_("Higher heating value"), "%.2f MJ/kg", fuel->hhv / 1e6);
  print_analysis (fuel);
  print_row (_("CO2"), _("%.3f kg/kg, %.1f kg/GJ on the lower heating value"), fuel->co2, combustion->co2_per_heat * 1e9);
  if (fuel->fossil_share < 1.0)
    print_row (_("Fossil share of its carbon"), "%.0f %%", 1e2 * fuel->fossil_share);
  print_row (_("Excess air"), "%.1f %%", 1e2 * combustion->excess_air);
  print_row (_("Air"), "%.3f kg/kg", combustion->air);
  print_row (_("Flue gas"), "%.3f kg/kg", combustion->gas_mass);
  print_row (_("Oxygen in the dry gas"), "%.2f %%", 1e2 * combustion->oxygen_dry);
  print_gas (combustion->gas);
  print_temperature (_("Adiabatic flame temperature"), burnt->flame.T);
  print_temperature (_("Water dew point"), burnt->T_dew);
  print_temperature (_("Acid dew point"), burnt->T_acid);
  if (fuel->source != NULL)
    print_row (_("Source"), "%s", fuel->source);
}

static char *
burnt_json (const Burnt *burnt)
{
  const HlFuel *fuel = &burnt->fuel;
  const HlCombustion *combustion = &burnt->combustion;
  g_autofree double *moles = g_new (double, hl_gas_n_species ());
  HlJsonText *json = hl_json_text_new ();
  hl_json_text_begin (json, NULL, '{', FALSE);
  hl_json_text_string (json, "fuel", fuel->name);
  hl_json_text_string (json, "source", fuel->source != NULL ? fuel->source : "");
  const struct { const char *name; double value; } numbers[] = {
    { "lhv_J_kg", fuel->lhv }, { "hhv_J_kg", fuel->hhv }, { "co2_kg_kg", fuel->co2 }, { "co2_kg_J", combustion->co2_per_heat },
    { "fossil_share", fuel->fossil_share }, { "carbon", fuel->carbon }, { "hydrogen", fuel->hydrogen }, { "oxygen", fuel->oxygen },
    { "nitrogen", fuel->nitrogen }, { "sulphur", fuel->sulphur }, { "chlorine", fuel->chlorine }, { "water", fuel->moisture }, { "ash", fuel->ash },
    { "excess_air", combustion->excess_air }, { "air_needed_kg_kg", combustion->air_needed }, { "air_kg_kg", combustion->air },
    { "humidity_ratio", burnt->humidity_ratio }, { "gas_kg_kg", combustion->gas_mass }, { "oxygen_dry", combustion->oxygen_dry },
    { "flame_T_K", burnt->flame.T }, { "water_dew_point_K", burnt->T_dew }, { "acid_dew_point_K", burnt->T_acid },
  };
  hl_json_text_boolean (json, "lhv_is_estimated", fuel->is_lhv_estimated);
  for (gsize i = 0; i < G_N_ELEMENTS (numbers); i++)
    hl_json_text_number (json, numbers[i].name, numbers[i].value);
  hl_json_text_string (json, "medium", hl_fluid_id (combustion->gas));
  hl_json_text_begin (json, "mole_fractions", '{', FALSE);
  hl_gas_moles (combustion->gas, moles);
  for (guint i = 0; i < hl_gas_n_species (); i++)
    if (moles[i] > 0.0)
      hl_json_text_number (json, hl_gas_species_formula (i), moles[i]);
  hl_json_text_end (json);
  hl_json_text_end (json);
  return hl_json_text_finish (json);
}

static HlExit
list_fuels (void)
{
  g_auto(GStrv) names = hl_fuel_list ();
  printf ("| %s | %s [MJ/kg] | %s [MJ/kg] | CO2 [kg/GJ] | %s |\n|---|---|---|---|---|\n", _("Fuel"), _("Lower heating value"), _("Higher heating value"), _("Source"));
  for (guint i = 0; names[i] != NULL; i++)
    {
      HlFuel fuel;
      if (hl_fuel_find (names[i], &fuel, NULL))
        printf ("| `%s` | %.2f | %.2f | %.1f | %s |\n", names[i], fuel.lhv / 1e6, fuel.hhv / 1e6, fuel.co2 / fuel.lhv * 1e9, fuel.source);
    }
  return HL_EXIT_DONE;
}

static HlExit
run_fuel (const HlArguments *arguments)
{
  GError *error = NULL;
  Burnt burnt = { .flame.T = NAN };
  const char *json_path = hl_arguments_value (arguments, "json");
  if (hl_arguments_n_words (arguments) == 0)
    return list_fuels ();
  if (!burn (arguments, &burnt, &error))
    return hl_complain (HL_EXIT_USAGE, error);
  if (json_path == NULL)
    {
      print_burnt (&burnt);
      return HL_EXIT_DONE;
    }
  g_autofree char *json = burnt_json (&burnt);
  if (!hl_export_text_file (json, json_path, &error))
    return hl_complain (HL_EXIT_FILE, error);
  return HL_EXIT_DONE;
}

static const HlBatchOption options[] = {
  { "excess-air", N_("SHARE"), FALSE, N_("air above what is needed, such as 10%; nothing unless given") },
  { "oxygen", N_("SHARE"), FALSE, N_("oxygen in the dry flue gas instead of the excess, such as 3%") },
  { "moisture", N_("SHARE"), FALSE, N_("water in the fuel as fired, instead of the fuel's own") },
  { "air", N_("TEMPERATURE"), FALSE, N_("temperature of the air, 25 °C unless given") },
  { "humidity", N_("SHARE"), FALSE, N_("relative humidity of the air; dry unless given") },
  { "pressure", N_("PRESSURE"), FALSE, N_("of air and gas, 1.01325 bar unless given") },
  { "json", N_("FILE"), FALSE, N_("write the results as JSON, in SI") },
};

const HlBatchCommand hl_command_fuel = {
  .name = "fuel",
  .usage = N_("[FUEL] [options]"),
  .summary = N_("heating values, air and flue gas of a fuel, or the list of fuels"),
  .details = N_(
    "FUEL is a name from the list, which is printed where none is given; the components of a gas by moles,\n"
    "mole:CH4=0.9,C2H6=0.06,N2=0.04; or an analysis as fired by mass with the lower heating value in MJ/kg,\n"
    "mass:C=0.6,H=0.04,O=0.08,S=0.01,ash=0.12,water=0.15,LHV=23.4 (estimated where it is left out).\n"
    "Everything burns; nothing dissociates, so that above some 1500 °C a real flame is colder. The acid dew point\n"
    "takes a fiftieth of the sulphur as SO3. The medium can be given to the command state and to streams of a plant.\n"),
  .least = 0, .most = 1,
  .options = options, .n_options = G_N_ELEMENTS (options),
  .run = run_fuel,
};
