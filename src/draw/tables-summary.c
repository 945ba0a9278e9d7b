/* The performance summary: powers, heats, efficiencies and rates of a solved plant, each with its basis.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "draw/tables.h"
#include <math.h>
#include "plant/i18n.h"

struct _HlSummary {
  GArray *lines;
};

static void
clear_line (gpointer data)
{
  g_free (((HlSummaryLine *) data)->name);
}

static void
add (HlSummary *summary, const char *group, const char *key, const char *name, const char *basis, HlDimension dimension, double value)
{
  HlSummaryLine line = { .group = group, .basis = basis, .dimension = dimension, .value = value };
  if (!isfinite (value))
    return;
  g_strlcpy (line.key, key, sizeof line.key);
  line.name = g_strdup (name);
  line.is_percent = dimension == HL_DIMENSION_RATIO;
  g_array_append_val (summary->lines, line);
}

/* A result of the plant; NaN where its terms do not exist. */
static double
result (const HlSolution *solution, const char *key)
{
  for (guint n = 0; n < hl_solution_n_results (solution); n++)
    {
      double value;
      if (g_str_equal (hl_solution_result (solution, n, &value)->key, key))
        return value;
    }
  return NAN;
}

static double
of_component (const HlSolution *solution, const HlComponent *component, const char *key)
{
  HlAddress address = hl_address_component (component->id, key);
  double value;
  return hl_component_quantity_kind (component, key) != NULL && hl_solution_value (solution, &address, &value) ? value : NAN;
}

/* Electrical over shaft power: generators, gearboxes; 1 where none is drawn. */
static double
result_of_generators (const HlSolution *solution)
{
  const HlPlant *plant = hl_solution_plant (solution);
  double electrical = 0.0, mechanical = 0.0;
  for (guint i = 0; i < hl_plant_n_components (plant); i++)
    {
      const HlComponent *component = hl_plant_component (plant, i);
      if (component->kind->shaft != HL_SHAFT_GENERATOR)
        continue;
      electrical += of_component (solution, component, "power");
      mechanical += of_component (solution, component, "shaft_power");
    }
  return mechanical > 0.0 ? electrical / mechanical : 1.0;
}

typedef gboolean (*IsMeant) (const HlComponent *component);
static gboolean is_generator (const HlComponent *component) { return component->kind->shaft == HL_SHAFT_GENERATOR; }
static gboolean has_motor (const HlComponent *component) { return hl_component_quantity_kind (component, "motor_power") != NULL; }
static gboolean is_condenser (const HlComponent *component) { return g_str_equal (component->kind->id, "condenser"); }
static gboolean is_user (const HlComponent *component) { return g_str_equal (component->kind->id, "steam_user"); }
static gboolean has_fans (const HlComponent *component) { return hl_component_quantity_kind (component, "fan_power") != NULL; }
static gboolean is_cooled_by_air (const HlComponent *component) { return g_str_equal (component->kind->id, "air_condenser"); }
static gboolean is_district (const HlComponent *component) { return g_str_equal (component->kind->id, "district_heater"); }
static gboolean is_tower (const HlComponent *component) { return g_str_equal (component->kind->id, "cooling_tower"); }
static gboolean is_heater (const HlComponent *component) { return is_user (component) || is_district (component); }
static gboolean is_rejecting (const HlComponent *component) { return is_condenser (component) || is_cooled_by_air (component); }
static gboolean is_make_up (const HlComponent *component) { return g_str_equal (component->kind->id, "make_up"); }

/* A line for each component that has a share of a sum, where the sum has several or @always. */
static void
add_parts (HlSummary *summary, const HlSolution *solution, const char *group, const char *sum_key, IsMeant is_meant, const char *quantity,
           gboolean always)
{
  const HlPlant *plant = hl_solution_plant (solution);
  guint first = summary->lines->len;
  for (guint i = 0; i < hl_plant_n_components (plant); i++)
    {
      const HlComponent *component = hl_plant_component (plant, i);
      double value = is_meant (component) ? of_component (solution, component, quantity) : NAN;
      g_autofree char *key = g_strdup_printf ("%s:%s", sum_key, component->id), *name = NULL;
      if (!(fabs (value) > 0.0))
        continue;
      name = g_strdup_printf ("%s %s", component->id, *component->name != '\0' ? component->name : _(component->kind->shelf_name));
      add (summary, group, key, name, "", HL_DIMENSION_POWER, value);
      g_array_index (summary->lines, HlSummaryLine, summary->lines->len - 1).is_part = TRUE;
    }
  if (!always && summary->lines->len - first < 2)
    g_array_set_size (summary->lines, first);
}

static double
sum_over (const HlSolution *solution, IsMeant is_meant, const char *quantity)
{
  const HlPlant *plant = hl_solution_plant (solution);
  double sum = 0.0;
  gboolean is_there = FALSE;
  for (guint i = 0; i < hl_plant_n_components (plant); i++)
    {
      const HlComponent *component = hl_plant_component (plant, i);
      double value = is_meant (component) ? of_component (solution, component, quantity) : NAN;
      if (!isfinite (value))
        continue;
      sum += value;
      is_there = TRUE;
    }
  return is_there ? sum : NAN;
}

static void
add_power (HlSummary *summary, const HlSolution *solution)
{
  const char *group = _("Power");
  double other = result (solution, "other_consumption");
  add (summary, group, "gross_power", _("Gross power"), _("at the generator terminals"), HL_DIMENSION_POWER, result (solution, "gross_power"));
  add_parts (summary, solution, group, "gross_power", is_generator, "power", FALSE);
  add (summary, group, "power_input", _("Power input"), _("motors of compressors, pumps and fans"), HL_DIMENSION_POWER, result (solution, "power_input"));
  add (summary, group, "own_consumption", _("Own consumption"), "", HL_DIMENSION_POWER, result (solution, "own_consumption"));
  add_parts (summary, solution, group, "own_consumption", has_motor, "motor_power", TRUE);
  add_parts (summary, solution, group, "own_consumption", has_fans, "fan_power", TRUE);
  if (other > 0.0)
    {
      add (summary, group, "other_consumption", _("Other consumption"), _("not drawn"), HL_DIMENSION_POWER, other);
      g_array_index (summary->lines, HlSummaryLine, summary->lines->len - 1).is_part = TRUE;
    }
  add (summary, group, "net_power", _("Net power"), _("gross power less own consumption"), HL_DIMENSION_POWER, result (solution, "net_power"));
}

static void
add_heat (HlSummary *summary, const HlSolution *solution, double fuel_hhv)
{
  const char *group = _("Heat");
  add (summary, group, "heat_input", _("Heat input"), _("to the working fluid"), HL_DIMENSION_POWER, result (solution, "heat_input"));
  add (summary, group, "fuel_heat_lhv", _("Fuel heat"), _("lower heating value (LHV)"), HL_DIMENSION_POWER, result (solution, "fuel_heat"));
  add (summary, group, "fuel_heat_hhv", _("Fuel heat"), _("higher heating value (HHV)"), HL_DIMENSION_POWER, fuel_hhv);
  add (summary, group, "fuel_flow", _("Fuel flow"), "", HL_DIMENSION_MASS_FLOW, result (solution, "fuel_flow"));
  add (summary, group, "heat_delivered", _("Heat delivered"), _("to process steam users and heat customers"), HL_DIMENSION_POWER,
       result (solution, "heat_delivered"));
  add_parts (summary, solution, group, "heat_delivered", is_heater, "heat", FALSE);
  add (summary, group, "cooling_duty", _("Cooling duty"), _("heat given to the surroundings by condensers"), HL_DIMENSION_POWER,
       result (solution, "heat_rejected"));
  add_parts (summary, solution, group, "cooling_duty", is_rejecting, "heat", FALSE);
}

/* Figures of the trade that mean one expansion from live steam to exhaust: NaN where several sections share it. */
typedef struct { double theoretical_steam_rate, engine_efficiency; } Turbine;

static gboolean
state_at (const HlSolution *solution, const HlComponent *component, const char *port, HlState *state)
{
  const HlPlant *plant = hl_solution_plant (solution);
  const HlStream *stream = hl_plant_stream_at (plant, component->id, port);
  HlStreamResult result;
  if (stream == NULL)
    return FALSE;
  hl_solution_stream (solution, (guint) hl_plant_stream_index (plant, stream->id), &result);
  *state = result.state;
  return result.has_state;
}

static Turbine
read_turbine (const HlSolution *solution)
{
  const HlPlant *plant = hl_solution_plant (solution);
  const HlComponent *only = NULL;
  Turbine turbine = { NAN, NAN };
  HlState in, out, ideal;
  for (guint i = 0; i < hl_plant_n_components (plant); i++)
    if (hl_plant_component (plant, i)->kind->shaft == HL_SHAFT_DRIVES)
      {
        if (only != NULL)
          return turbine;
        only = hl_plant_component (plant, i);
      }
  if (only == NULL || !state_at (solution, only, "inlet", &in) || !state_at (solution, only, "exhaust", &out))
    return turbine;
  const HlStream *stream = hl_plant_stream_at (plant, only->id, "inlet");
  HlStreamResult result;
  hl_solution_stream (solution, (guint) hl_plant_stream_index (plant, stream->id), &result);
  if (hl_fluid_state_ps (result.fluid, out.p, in.s, &ideal) != HL_OK || !(in.h > ideal.h))
    return turbine;
  double generator = result_of_generators (solution);
  turbine.theoretical_steam_rate = 1.0 / (in.h - ideal.h);
  turbine.engine_efficiency = (in.h - out.h) * of_component (solution, only, "mechanical_efficiency") * generator / (in.h - ideal.h);
  return turbine;
}

/* A number that nobody reads in per cent. */
static void
add_performance (HlSummary *summary, const HlSolution *solution, const char *key, const char *name, const char *basis)
{
  guint before = summary->lines->len;
  add (summary, _("Efficiency"), key, name, basis, HL_DIMENSION_RATIO, result (solution, key));
  if (summary->lines->len > before)
    g_array_index (summary->lines, HlSummaryLine, before).is_percent = FALSE;
}

static void
add_efficiencies (HlSummary *summary, const HlSolution *solution, gboolean has_fuel, double fuel_hhv, const Turbine *turbine)
{
  const char *group = _("Efficiency"), *lhv = has_fuel ? _("fuel heat, LHV") : _("heat input"), *hhv = _("fuel heat, HHV");
  double gross = result (solution, "gross_power");
  add (summary, group, "cycle_efficiency", _("Cycle efficiency"), _("shaft power of turbines less pumps, over heat input"), HL_DIMENSION_RATIO,
       result (solution, "cycle_efficiency"));
  add (summary, group, "gross_efficiency_lhv", _("Gross efficiency"), lhv, HL_DIMENSION_RATIO, result (solution, "gross_efficiency"));
  add (summary, group, "net_efficiency_lhv", _("Net efficiency"), lhv, HL_DIMENSION_RATIO, result (solution, "net_efficiency_lhv"));
  add (summary, group, "gross_efficiency_hhv", _("Gross efficiency"), hhv, HL_DIMENSION_RATIO, gross / fuel_hhv);
  add (summary, group, "net_efficiency_hhv", _("Net efficiency"), hhv, HL_DIMENSION_RATIO, result (solution, "net_efficiency_hhv"));
  add (summary, group, "utilisation", _("Utilisation"), has_fuel ? _("net power and heat delivered, over fuel heat, LHV")
       : _("net power and heat delivered, over heat input"), HL_DIMENSION_RATIO, result (solution, "utilisation"));
  add (summary, group, "engine_efficiency", _("Engine efficiency"), _("drop of the section times mechanical and generator efficiency, over its drop at constant entropy"),
       HL_DIMENSION_RATIO, turbine->engine_efficiency);
  add (summary, group, "exergy_efficiency", _("Exergy efficiency"), _("net power and exergy of heat delivered, over exergy input"), HL_DIMENSION_RATIO,
       result (solution, "exergy_efficiency"));
  add (summary, group, "carnot_efficiency", _("Carnot efficiency"), _("lowest and highest temperature of the working fluid"), HL_DIMENSION_RATIO,
       result (solution, "carnot_efficiency"));
  add_performance (summary, solution, "cop", _("Coefficient of performance, heating"), _("heat delivered over power input"));
  add_performance (summary, solution, "cop_cooling", _("Coefficient of performance, cooling"), _("heat taken up over power input"));
}

static void
add_rates (HlSummary *summary, const HlSolution *solution, double fuel, double fuel_hhv, const Turbine *turbine)
{
  const char *group = _("Rates");
  double gross = result (solution, "gross_power"), net = result (solution, "net_power"), heat = result (solution, "heat_input");
  double motors = sum_over (solution, has_motor, "motor_power");
  add (summary, group, "turbine_heat_rate_gross", _("Gross turbine heat rate"), _("heat input over gross power"), HL_DIMENSION_HEAT_RATE,
       result (solution, "heat_rate"));
  if (isfinite (motors) && gross > motors)
    add (summary, group, "turbine_heat_rate_net", _("Net turbine heat rate"), _("heat input over gross power less pumping power"),
         HL_DIMENSION_HEAT_RATE, heat / (gross - motors));
  if (gross > 0.0)
    {
      add (summary, group, "plant_heat_rate_gross_lhv", _("Gross plant heat rate"), _("fuel heat, LHV"), HL_DIMENSION_HEAT_RATE, fuel / gross);
      add (summary, group, "plant_heat_rate_gross_hhv", _("Gross plant heat rate"), _("fuel heat, HHV"), HL_DIMENSION_HEAT_RATE, fuel_hhv / gross);
    }
  if (net > 0.0)
    {
      add (summary, group, "plant_heat_rate_net_lhv", _("Net plant heat rate"), _("fuel heat, LHV"), HL_DIMENSION_HEAT_RATE, fuel / net);
      add (summary, group, "plant_heat_rate_net_hhv", _("Net plant heat rate"), _("fuel heat, HHV"), HL_DIMENSION_HEAT_RATE, fuel_hhv / net);
    }
  add (summary, group, "steam_rate", _("Steam rate"), _("live steam over gross power"), HL_DIMENSION_STEAM_RATE, result (solution, "steam_rate"));
  add (summary, group, "steam_rate_theoretical", _("Theoretical steam rate"), _("one over the section's drop at constant entropy"), HL_DIMENSION_STEAM_RATE,
       turbine->theoretical_steam_rate);
}

static void
add_flows (HlSummary *summary, const HlSolution *solution)
{
  const char *group = _("Water and steam");
  add (summary, group, "live_steam", _("Live steam"), "", HL_DIMENSION_MASS_FLOW,
       result (solution, "steam_rate") * result (solution, "gross_power"));
  add (summary, group, "make_up", _("Make-up water"), "", HL_DIMENSION_MASS_FLOW, sum_over (solution, is_make_up, "outlet.m"));
  add (summary, group, "tower_make_up", _("Make-up of cooling towers"), "", HL_DIMENSION_MASS_FLOW, sum_over (solution, is_tower, "make_up_flow"));
  add (summary, group, "cooling_water", _("Cooling water"), "", HL_DIMENSION_MASS_FLOW, sum_over (solution, is_condenser, "cooling_flow"));
  add (summary, group, "exhaust_moisture", _("Exhaust moisture"), _("wettest turbine exhaust"), HL_DIMENSION_RATIO,
       result (solution, "exhaust_moisture"));
}

static void
add_exergy (HlSummary *summary, const HlSolution *solution)
{
  const char *group = _("Second law");
  add (summary, group, "exergy_input", _("Exergy input"), _("fuel, heat, streams and electricity that come in"), HL_DIMENSION_POWER, result (solution, "exergy_input"));
  add (summary, group, "exergy_product", _("Exergy made"), _("net power and exergy of heat delivered"), HL_DIMENSION_POWER, result (solution, "exergy_product"));
  add (summary, group, "exergy_loss", _("Exergy lost"), _("leaves unused"), HL_DIMENSION_POWER, result (solution, "exergy_loss"));
  add (summary, group, "exergy_destruction", _("Exergy destroyed"), _("dead state temperature times entropy produced"), HL_DIMENSION_POWER,
       result (solution, "exergy_destruction"));
}

HlSummary *
hl_summary_new (const HlSolution *solution)
{
  HlSummary *summary = g_new0 (HlSummary, 1);
  g_return_val_if_fail (solution != NULL, NULL);
  summary->lines = g_array_new (FALSE, FALSE, sizeof (HlSummaryLine));
  g_array_set_clear_func (summary->lines, clear_line);
  /* Where the search stood is no performance. */
  if (hl_solution_is_solved (solution))
    {
      double fuel = result (solution, "fuel_heat"), fuel_hhv = result (solution, "net_power") / result (solution, "net_efficiency_hhv");
      add_power (summary, solution);
      add_heat (summary, solution, fuel_hhv);
      Turbine turbine = read_turbine (solution);
      add_efficiencies (summary, solution, fuel > 0.0, fuel_hhv, &turbine);
      add_rates (summary, solution, fuel, fuel_hhv, &turbine);
      add_flows (summary, solution);
      add_exergy (summary, solution);
    }
  return summary;
}

void
hl_summary_free (HlSummary *summary)
{
  if (summary == NULL)
    return;
  g_array_unref (summary->lines);
  g_free (summary);
}

guint
hl_summary_n_lines (const HlSummary *summary)
{
  g_return_val_if_fail (summary != NULL, 0);
  return summary->lines->len;
}

const HlSummaryLine *
hl_summary_line (const HlSummary *summary, guint n)
{
  g_return_val_if_fail (summary != NULL && n < summary->lines->len, NULL);
  return &g_array_index (summary->lines, HlSummaryLine, n);
}

const HlSummaryLine *
hl_summary_find (const HlSummary *summary, const char *key)
{
  g_return_val_if_fail (summary != NULL && key != NULL, NULL);
  for (guint n = 0; n < summary->lines->len; n++)
    if (g_str_equal (hl_summary_line (summary, n)->key, key))
      return hl_summary_line (summary, n);
  return NULL;
}

char *
hl_summary_text (const HlSummaryLine *line, HlUnitSet units)
{
  g_return_val_if_fail (line != NULL, NULL);
  if (line->is_percent)
    return g_strdup_printf ("%.2f %%", fabs (line->value) < 0.5e-4 ? 0.0 : 100.0 * line->value);
  return hl_units_format (line->value, line->dimension, units);
}
