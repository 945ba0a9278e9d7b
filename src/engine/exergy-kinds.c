/* Second law by kind: what counts as fuel and what as product, one row a kind.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "engine/exergy.h"
#include "engine/components/components.h"
#include "plant/circuit.h"
#include "plant/i18n.h"
#include <math.h>
#include <string.h>

static const HlExergyT nowhere = { -1, -1, -1, NAN };

static HlExergyT
at_node (int node)
{
  HlExergyT t = nowhere;
  t.node = node;
  return t;
}

static HlExergyT
at_var (int var, int plus)
{
  HlExergyT t = nowhere;
  t.var = var;
  t.plus = plus;
  return t;
}

static HlExergyT
at_constant (double T)
{
  HlExergyT t = nowhere;
  t.constant = T;
  return t;
}

static void
leak (HlExergySink *sink, const char *in, const char *out)
{
  hl_exergy_power (sink, HL_ROLE_LEAK, -1.0, in);
  hl_exergy_power (sink, HL_ROLE_LEAK, 1.0, out);
}

/* What the connected ports of one side take in, once more and the other way round: it passes through a door of the plant. */
static void
copy_side (HlExergySink *sink, int side, HlExergyRole role, HlExergyDoor door)
{
  guint first = sink->terms->len;
  hl_exergy_sides (sink, role);
  for (guint k = sink->terms->len; k-- > first;)
    {
      HlExergyTerm *term = &g_array_index (sink->terms, HlExergyTerm, k);
      term->sign = -term->sign;
      term->door = door;
      if (side >= 0 && term->side != side)
        g_array_remove_index (sink->terms, k);
    }
}

/* --- heat and fuel ------------------------------------------------------------------ */

static void
book_heat_input (HlExergySink *sink)
{
  int source = hl_exergy_own (sink, "source_T");
  hl_exergy_sides (sink, HL_ROLE_PRODUCT);
  if (source < 0)
    copy_side (sink, -1, HL_ROLE_FUEL, HL_DOOR_HEAT);
  else
    hl_exergy_heat (sink, HL_ROLE_FUEL, 1.0, "heat", at_var (source, -1), at_var (source, -1))->door = HL_DOOR_HEAT;
}

/* A source that is not drawn gives its heat at the temperature of what takes it up.  Below that of the dead state it is the source that gains:
 * what a refrigerating machine is there for. */
static void
book_evaporator (HlExergySink *sink)
{
  hl_exergy_sides (sink, HL_ROLE_SIDE);
  if (hl_exergy_node (sink, "hot_inlet") >= 0)
    return;
  guint first = sink->terms->len;
  copy_side (sink, -1, HL_ROLE_SIDE, HL_DOOR_HEAT);
  for (guint k = first; k < sink->terms->len; k++)
    g_array_index (sink->terms, HlExergyTerm, k).side = hl_kind_side_of_port (sink->component->kind, "hot_inlet");
}

static void
book_boiler (HlExergySink *sink)
{
  static const char key[] = "fuel_exergy_ratio";
  hl_exergy_sides (sink, HL_ROLE_PRODUCT);
  HlExergyTerm *fuel = hl_exergy_power (sink, HL_ROLE_FUEL, 1.0, "fuel_heat");
  if (fuel != NULL)
    {
      const HlQuantityKind *kind = hl_component_quantity_kind (sink->component, key);
      fuel->form = HL_TERM_FUEL;
      fuel->door = HL_DOOR_FUEL;
      fuel->ratio = hl_exergy_own (sink, key);
      /* A file from before the ratio existed takes the usual one of its fuel. */
      fuel->ratio_value = kind != NULL ? hl_component_default (sink->component, kind, 0) : NAN;
    }
  int T = hl_exergy_own (sink, "flue_gas_T");
  if (T < 0)
    {
      hl_exergy_power (sink, HL_ROLE_LEAK, -1.0, "flue_loss");
      return;
    }
  /* Sensible heat from the flue gas down to the air, and fuel that did not burn. */
  hl_exergy_heat (sink, HL_ROLE_LOSS, -1.0, "stack_loss", at_var (T, -1), at_constant (hl_plant_site (sink->model->plant)->ambient_T))->door = HL_DOOR_LOSS;
  HlExergyTerm *unburned = hl_exergy_power (sink, HL_ROLE_LOSS, -1.0, "unburned_loss");
  if (unburned != NULL && fuel != NULL)
    {
      unburned->form = HL_TERM_FUEL;
      unburned->door = HL_DOOR_LOSS;
      unburned->ratio = hl_exergy_own (sink, key);
      unburned->ratio_value = hl_component_default (sink->component, hl_component_quantity_kind (sink->component, key), 0);
    }
  hl_exergy_power (sink, HL_ROLE_LEAK, -1.0, "radiation_loss");
}

/* --- shafts ---------------------------------------------------------------------------- */

static void
book_generator (HlExergySink *sink)
{
  hl_exergy_power (sink, HL_ROLE_FUEL, 1.0, "shaft_power");
  hl_exergy_power (sink, HL_ROLE_PRODUCT, -1.0, "power");
  leak (sink, "shaft_power", "power");
}

static void
book_motor (HlExergySink *sink)
{
  hl_exergy_power (sink, HL_ROLE_FUEL, 1.0, "motor_power");
  hl_exergy_power (sink, HL_ROLE_PRODUCT, -1.0, "power");
  leak (sink, "motor_power", "power");
}

static void
book_gearbox (HlExergySink *sink)
{
  int in = hl_exergy_own (sink, "input_power");
  gboolean runs_back = in >= 0 && hl_system_value (sink->model->system, in) < 0.0;
  /* Both are negative where power runs from the output to the input. */
  hl_exergy_power (sink, HL_ROLE_FUEL, runs_back ? -1.0 : 1.0, runs_back ? "output_power" : "input_power");
  hl_exergy_power (sink, HL_ROLE_PRODUCT, runs_back ? 1.0 : -1.0, runs_back ? "input_power" : "output_power");
  leak (sink, "input_power", "output_power");
}

/* --- cooling ----------------------------------------------------------------------------- */

static void
book_condenser (HlExergySink *sink)
{
  guint first = sink->terms->len;
  int T = hl_exergy_own (sink, "cooling_inlet_T"), rise = hl_exergy_own (sink, "cooling_rise");
  gboolean is_drawn = hl_exergy_node (sink, "cooling_inlet") >= 0 || hl_exergy_node (sink, "cooling_outlet") >= 0;
  hl_exergy_sides (sink, HL_ROLE_SIDE);
  for (guint k = first; k < sink->terms->len; k++)
    if (g_array_index (sink->terms, HlExergyTerm, k).side == 1)
      g_array_index (sink->terms, HlExergyTerm, k).role = HL_ROLE_LOSS;
  if (is_drawn)
    return;
  if (T < 0 || rise < 0)
    copy_side (sink, 0, HL_ROLE_LOSS, HL_DOOR_LOSS);
  else
    hl_exergy_heat (sink, HL_ROLE_LOSS, -1.0, "heat", at_var (T, -1), at_var (T, rise))->door = HL_DOOR_LOSS;
}

static void
book_air_condenser (HlExergySink *sink)
{
  int own = hl_exergy_own (sink, "ambient_T");
  HlExergyT air = own >= 0 ? at_var (own, -1) : at_constant (hl_plant_site (sink->model->plant)->ambient_T);
  hl_exergy_sides (sink, HL_ROLE_SIDE);
  hl_exergy_heat (sink, HL_ROLE_LOSS, -1.0, "heat", air, air)->door = HL_DOOR_LOSS;
  hl_exergy_power (sink, HL_ROLE_FUEL, 1.0, "fan_power");
  hl_exergy_power (sink, HL_ROLE_LEAK, -1.0, "fan_power");
}

static void
book_cooling_tower (HlExergySink *sink)
{
  int in = hl_exergy_node (sink, "water_inlet"), out = hl_exergy_node (sink, "water_outlet");
  hl_exergy_sides (sink, HL_ROLE_SIDE);
  if (in >= 0 && out >= 0)
    hl_exergy_heat (sink, HL_ROLE_LOSS, -1.0, "heat", at_node (in), at_node (out))->door = HL_DOOR_LOSS;
}

static void
book_pipe (HlExergySink *sink)
{
  int in = hl_exergy_node (sink, "inlet"), out = hl_exergy_node (sink, "outlet");
  hl_exergy_sides (sink, HL_ROLE_SIDE);
  if (in >= 0 && out >= 0 && hl_exergy_own (sink, "heat_loss") >= 0)
    hl_exergy_heat (sink, HL_ROLE_LOSS, -1.0, "heat_loss", at_node (in), at_node (out))->door = HL_DOOR_LOSS;
}

/* --- heaters and users --------------------------------------------------------------------- */

/* Each inlet against the mixture, by its own flow: what is richer gives, what is poorer gains. */
static void
book_open_heater (HlExergySink *sink)
{
  const HlModel *model = sink->model;
  int out = hl_exergy_node (sink, "outlet"), side = 0;
  if (out < 0)
    return;
  for (int k = model->first_port[sink->index]; k < model->first_port[sink->index + 1]; k++)
    {
      const HlPortNode *port = &g_array_index (model->ports, HlPortNode, k);
      int flow = hl_model_node (model, port->node)->m;
      if (port->is_out)
        continue;
      hl_exergy_flow (sink, HL_ROLE_SIDE, 1.0, flow, port->node)->side = side;
      hl_exergy_flow (sink, HL_ROLE_SIDE, -1.0, flow, out)->side = side;
      side = MIN (side + 1, 30);
    }
}

/* What leaves at the vent is a loss, and no part of the mixture. */
static void
book_vented_heater (HlExergySink *sink)
{
  int out = hl_exergy_node (sink, "outlet"), vent = hl_exergy_own (sink, "vent_flow"), h = hl_exergy_own (sink, "vent_h");
  book_open_heater (sink);
  if (out < 0 || vent < 0 || h < 0)
    return;
  hl_exergy_flow (sink, HL_ROLE_FUEL, 1.0, vent, out);
  HlExergyTerm *term = hl_exergy_flow (sink, HL_ROLE_LOSS, -1.0, vent, -1);
  term->form = HL_TERM_WATER;
  term->fluid = hl_model_node (sink->model, out)->fluid;
  term->p = hl_model_node (sink->model, out)->p;
  term->h = h;
  term->door = HL_DOOR_LOSS;
}

static void
own_water (HlExergySink *sink, double sign, const HlFluid *fluid, const char *p, const char *h)
{
  HlExergyTerm *term = hl_exergy_flow (sink, HL_ROLE_PRODUCT, sign, hl_exergy_own (sink, "water_flow"), -1);
  term->form = HL_TERM_WATER;
  term->fluid = fluid;
  term->p = hl_exergy_own (sink, p);
  term->h = hl_exergy_own (sink, h);
  term->door = HL_DOOR_DELIVERED;
}

static void
book_district_heater (HlExergySink *sink)
{
  int steam = hl_exergy_node (sink, "steam");
  hl_exergy_sides (sink, HL_ROLE_SIDE);
  if (steam < 0 || hl_exergy_node (sink, "water_inlet") >= 0 || hl_exergy_node (sink, "water_outlet") >= 0)
    return;
  own_water (sink, 1.0, sink->model->water, "water_p", "water_inlet_h");
  own_water (sink, -1.0, sink->model->water, "water_outlet_p", "water_outlet_h");
}

/* The process takes what its steam gives down to the condensate; what of that does not come back is lost. */
static void
book_steam_user (HlExergySink *sink)
{
  int steam = hl_exergy_node (sink, "steam"), out = hl_exergy_node (sink, "condensate"), lost = hl_exergy_own (sink, "lost_flow");
  if (steam < 0 || out < 0 || lost < 0)
    return;
  int flow = hl_model_node (sink->model, steam)->m;
  hl_exergy_sides (sink, HL_ROLE_SIDE);
  hl_exergy_flow (sink, HL_ROLE_PRODUCT, -1.0, flow, steam)->door = HL_DOOR_DELIVERED;
  hl_exergy_flow (sink, HL_ROLE_PRODUCT, 1.0, flow, out)->door = HL_DOOR_DELIVERED;
  hl_exergy_flow (sink, HL_ROLE_LOSS, -1.0, lost, out)->door = HL_DOOR_LOSS;
}

/* Streams that come from outside, and those that leave. */
static void
book_boundary (HlExergySink *sink)
{
  const HlModel *model = sink->model;
  for (int k = model->first_port[sink->index]; k < model->first_port[sink->index + 1]; k++)
    {
      const HlPortNode *port = &g_array_index (model->ports, HlPortNode, k);
      int flow = hl_model_node (model, port->node)->m;
      hl_exergy_flow (sink, HL_ROLE_SIDE, port->is_out ? -1.0 : 1.0, flow, port->node);
      hl_exergy_flow (sink, port->is_out ? HL_ROLE_FUEL : HL_ROLE_LOSS, port->is_out ? 1.0 : -1.0, flow, port->node)->door = HL_DOOR_STREAM;
    }
}

/* Heating surfaces on a gas path: two sides, and what the casing loses at the temperature of the gas. */
static void
book_bank (HlExergySink *sink)
{
  int in = hl_exergy_node (sink, "gas_inlet"), out = hl_exergy_node (sink, "gas_outlet");
  hl_exergy_sides (sink, HL_ROLE_SIDE);
  if (in >= 0 && out >= 0)
    hl_exergy_heat (sink, HL_ROLE_LOSS, -1.0, "heat_loss", at_node (in), at_node (out))->door = HL_DOOR_LOSS;
}

/* --- the table ------------------------------------------------------------------------------- */

#define FALLS     N_("It makes nothing: what the streams lose is destroyed here, for the sake of the components it serves.")
#define PASSES    NULL
#define GAS_SIDES N_("Fuel: what the gas gives up; product: what it heats gains; the heat of the casing leaves at the temperature of the gas, a loss.")
#define TWO_SIDES N_("Fuel: what the hot side gives up; product: what the cold side gains.")

static const HlExergyKind kinds[] = {
  { "heat_input", book_heat_input,
    N_("Fuel: the heat at the temperature of its source, where that is given, else at that of the fluid, so that nothing is destroyed; product: what the fluid gains.") },
  { "boiler", book_boiler,
    N_("Fuel: chemical exergy of the fuel, its ratio times the heat on the lower heating value; product: what live steam, reheat and blowdown gain. What leaves with the flue gas is a loss where its temperature is known, else destroyed here.") },
  { "turbine", NULL, N_("Fuel: what the steam gives up from inlet to outlets; product: shaft power.") },
  { "feed_pump_turbine", NULL, N_("Fuel: what the steam gives up from inlet to outlets; product: shaft power.") },
  { "control_stage", NULL, N_("Fuel: what the steam gives up from inlet to outlets; product: shaft power.") },
  { "generator", book_generator, N_("Fuel: shaft power; product: electrical power.") },
  { "motor", book_motor, N_("Fuel: electrical power; product: shaft power.") },
  { "gearbox", book_gearbox, N_("Fuel: shaft power taken; product: shaft power passed on.") },
  { "pump", NULL, N_("Fuel: power of its motor, or of its shaft; product: what the fluid gains.") },
  { "drain_pump", NULL, N_("Fuel: power of its motor, or of its shaft; product: what the fluid gains.") },
  { "compressor", NULL, N_("Fuel: power of its motor, or of its shaft; product: what the fluid gains.") },
  { "condenser", book_condenser,
    N_("It makes nothing: what the steam gives up is destroyed here, but for what the cooling water carries away, a loss.") },
  { "air_condenser", book_air_condenser,
    N_("It makes nothing: what the steam gives up, and the power of the fans, is destroyed here, but for what the air carries away, a loss.") },
  { "cooling_tower", book_cooling_tower, N_("It makes nothing: the heat leaves at the temperature of the water, a loss.") },
  { "closed_heater", NULL, N_("Fuel: what steam and drains give up; product: what the feedwater gains.") },
  { "open_heater", book_vented_heater,
    N_("Fuel: what the richer inlets give up on becoming the mixture, each by its flow; product: what the poorer ones gain.") },
  { "ejector", book_open_heater, N_("Fuel: what the motive steam gives up on becoming the mixture; product: what the flow drawn in gains.") },
  { "exchanger", NULL, TWO_SIDES },
  { "evaporator", book_evaporator,
    N_("Fuel: what the heat source gives up, or, where it is not drawn, its heat at the temperature of the medium; product: what the medium gains.") },
  { "expander", NULL, N_("Fuel: what the vapour gives up from inlet to exhaust; product: shaft power.") },
  { "recuperator", NULL, TWO_SIDES },
  { "economiser", book_bank, GAS_SIDES },
  { "evaporator_drum", book_bank, GAS_SIDES },
  { "superheater", book_bank, GAS_SIDES },
  { "reheater", book_bank, GAS_SIDES },
  { "air_preheater", book_bank, GAS_SIDES },
  { "flue_gas_condenser", book_bank, GAS_SIDES },
  { "steam_air_heater", NULL, TWO_SIDES },
  { "solar_field", book_heat_input, N_("Fuel and product: what the medium gains, so that nothing is destroyed here; the sun is not counted.") },
  { "fan", NULL, N_("Fuel: power of its motor, or of its shaft; product: what the fluid gains.") },
  { "district_heater", book_district_heater, N_("Fuel: what steam and drains give up; product: what the district water gains.") },
  { "steam_user", book_steam_user,
    N_("Fuel and product: what the steam gives up on becoming condensate, all of it the process's; water that does not come back is a loss.") },
  { "pipe", book_pipe, N_("It makes nothing: pressure lost is destroyed here; heat lost leaves at the temperature of the stream, a loss.") },
  { "valve", NULL, FALLS },
  { "expansion_valve", NULL, FALLS },
  { "mixer", NULL, FALLS },
  { "flash_vessel", NULL, FALLS },
  { "gland_seal", NULL, FALLS },
  { "hotwell", NULL, FALLS },
  { "header", NULL, FALLS },
  { "bypass_station", NULL, FALLS },
  { "moisture_separator", NULL, FALLS },
  { "desuperheater", NULL, FALLS },
  { "splitter", NULL, PASSES },
  { "make_up", book_boundary, PASSES },
  { "boundary", book_boundary, PASSES },
  { "gas_source", book_boundary, PASSES },
  { "stack", book_boundary, PASSES },
};

const HlExergyKind *
hl_exergy_kind (const HlKind *kind)
{
  for (guint k = 0; k < G_N_ELEMENTS (kinds); k++)
    if (strcmp (kinds[k].kind, kind->id) == 0)
      return &kinds[k];
  return NULL;
}
