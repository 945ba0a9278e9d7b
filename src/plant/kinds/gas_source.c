/* Where a gas path begins and ends: source of hot gas, fan, stack.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "plant/kinds/bank.h"

static const HlPortKind source_ports[] = {
  { .key = "outlet", .name = N_("gas outlet"), .direction = HL_PORT_OUT, .side = HL_SIDE_RIGHT, .x = 2, .y = 0, .medium = FLUE_GAS },
};

static const HlQuantityKind source_quantities[] = {
  { .key = "outlet.m", .sign = "m", .name = N_("Gas flow"), .group = N_("Gas"),
    .dimension = HL_DIMENSION_MASS_FLOW, .flags = HL_QUANTITY_USUAL,
    DEFAULT (50.0, N_("an example, no source")), NO_RANGE, LIMITS_FLOW, .yield_rank = 20,
    .help = N_("Flow of the hot gas.") },
  { .key = "outlet.T", .sign = "T", .name = N_("Gas temperature"), .group = N_("Gas"),
    .dimension = HL_DIMENSION_TEMPERATURE, .flags = HL_QUANTITY_USUAL | HL_QUANTITY_ASSUMED,
    DEFAULT (823.15, N_("common practice, no source: exhaust of gas turbines 450-640 °C")), RANGE (423.15, 1473.15), LIMITS_TEMPERATURE, .yield_rank = 30,
    .help = N_("Temperature of the hot gas.") },
  { .key = "outlet.p", .sign = "p", .name = N_("Gas pressure"), .group = N_("Gas"),
    .dimension = HL_DIMENSION_PRESSURE, .flags = HL_QUANTITY_USUAL | HL_QUANTITY_RESULT,
    NO_DEFAULT, RANGE (0.8e5, 1.2e5), LIMITS_PRESSURE, .yield_rank = 31,
    .help = N_("Pressure of the hot gas; mostly the stack and the losses on the way to it decide it.") },
  { .key = "heat", .sign = "Q", .name = N_("Heat of the gas"), .group = N_("Result"),
    .dimension = HL_DIMENSION_POWER, .flags = HL_QUANTITY_RESULT, NO_DEFAULT, NO_RANGE, LIMITS (-1e12, 1e12),
    .help = N_("Sensible heat of the gas above 25 °C, its water as vapour.") },
};

const HlKind hl_kind_gas_source = {
  .id = "gas_source", .letter = "HG", .name = N_("Hot gas source"), .shelf_name = N_("hot gas"), .shelf_group = N_("Gas path"),
  .help = N_("Exhaust of a gas turbine or gas of a furnace that comes in here."),
  .half_width = 2, .half_height = 2,
  .ports = ROWS (source_ports), .quantities = ROWS (source_quantities),
};

/* --- stack ------------------------------------------------------------------------ */

enum { ACID_NONE, ACID_SULPHUR };
static const char *const acid_words[] = { "none", "sulphur", NULL };
static const char *const acid_names[] = { N_("clean"), N_("holds sulphur trioxide"), NULL };

static const HlOptionKind stack_options[] = {
  { .key = "gas", .name = N_("Gas"), .least = 0, .most = 1, .usual = ACID_NONE, .choices = acid_words, .choice_names = acid_names },
};
#define WITH_ACID .when_option = "gas", .when_choice = ACID_SULPHUR

static const HlPortKind stack_ports[] = {
  { .key = "inlet", .name = N_("gas inlet"), .direction = HL_PORT_IN, .side = HL_SIDE_LEFT, .x = -2, .y = 2, .medium = FLUE_GAS },
};

static const HlQuantityKind stack_quantities[] = {
  { .key = "inlet.T", .sign = "T", .name = N_("Stack temperature"), .group = N_("Gas"),
    .dimension = HL_DIMENSION_TEMPERATURE, .flags = HL_QUANTITY_RESULT | HL_QUANTITY_USUAL, NO_DEFAULT, NO_RANGE, LIMITS_TEMPERATURE, .yield_rank = 15,
    .help = N_("Temperature of the gas as it leaves the plant.") },
  { .key = "inlet.p", .sign = "p", .name = N_("Pressure"), .group = N_("Gas"),
    .dimension = HL_DIMENSION_PRESSURE, .flags = HL_QUANTITY_ASSUMED | HL_QUANTITY_USUAL,
    DEFAULT (101325.0, N_("the standard atmosphere")), RANGE (0.6e5, 1.1e5), LIMITS_PRESSURE, .yield_rank = 80,
    .help = N_("Pressure of the gas at the foot of the stack.") },
  { .key = "heat", .sign = "Q", .name = N_("Stack loss"), .group = N_("Result"),
    .dimension = HL_DIMENSION_POWER, .flags = HL_QUANTITY_RESULT, NO_DEFAULT, NO_RANGE, LIMITS (-1e12, 1e12), .yield_rank = 18,
    .help = N_("Sensible heat of the gas above 25 °C, its water as vapour; it counts as heat rejected.") },
  { .key = "water_dew_point", .sign = "T", .name = N_("Water dew point"), .group = N_("Dew points"),
    .dimension = HL_DIMENSION_TEMPERATURE, .flags = HL_QUANTITY_RESULT, NO_DEFAULT, NO_RANGE, LIMITS_TEMPERATURE, .yield_rank = 16,
    .help = N_("Saturation temperature at the partial pressure of the water vapour.") },
  { .key = "so3_fraction", .sign = "y", .name = N_("Sulphur trioxide in the gas"), .group = N_("Dew points"),
    .dimension = HL_DIMENSION_RATIO, .flags = HL_QUANTITY_ASSUMED,
    DEFAULT (10e-6, N_("common practice, no source: 1 to 40 parts in a million, a few per cent of the sulphur dioxide")), RANGE (0.5e-6, 60e-6), LIMITS (0.0, 0.01), .yield_rank = 90,
    .help = N_("Volume fraction of sulphur trioxide; a few parts in a million raise the acid dew point far above that of water."), WITH_ACID },
  { .key = "acid_dew_point", .sign = "T", .name = N_("Acid dew point"), .group = N_("Dew points"),
    .dimension = HL_DIMENSION_TEMPERATURE, .flags = HL_QUANTITY_RESULT, NO_DEFAULT, NO_RANGE, LIMITS_TEMPERATURE, .yield_rank = 17,
    .help = N_("Temperature below which sulphuric acid condenses: Verhoff and Banchero 1974."), WITH_ACID },
};

const HlKind hl_kind_stack = {
  .id = "stack", .letter = "ST", .name = N_("Stack"), .shelf_name = N_("stack"), .shelf_group = N_("Gas path"),
  .help = N_("Flue gas leaves the plant here; counts its heat as rejected and looks after its dew points."),
  .half_width = 2, .half_height = 3,
  .ports = ROWS (stack_ports), .options = ROWS (stack_options), .quantities = ROWS (stack_quantities),
};

/* --- fan -------------------------------------------------------------------------- */

static const HlPortKind fan_ports[] = {
  { .key = "inlet", .name = N_("inlet"), .direction = HL_PORT_IN, .side = HL_SIDE_LEFT, .x = -2, .y = 0, .medium = "air" },
  { .key = "outlet", .name = N_("outlet"), .direction = HL_PORT_OUT, .side = HL_SIDE_RIGHT, .x = 2, .y = 0, .medium = "air" },
};

static const HlQuantityKind fan_quantities[] = {
  { .key = "pressure_rise", .sign = "Δp", .name = N_("Pressure rise"), .group = N_("Delivery"),
    .dimension = HL_DIMENSION_PRESSURE_DIFFERENCE, .flags = HL_QUANTITY_ASSUMED | HL_QUANTITY_USUAL,
    DEFAULT (3000.0, N_("common practice, no source: 10-60 mbar")), RANGE (300.0, 15000.0), LIMITS (HL_FROM_ZERO, 1e7), .yield_rank = 20,
    .help = N_("Outlet pressure minus inlet pressure.") },
  { .key = "isentropic_efficiency", .sign = "η", .name = N_("Isentropic efficiency"), .group = N_("Delivery"),
    .dimension = HL_DIMENSION_RATIO, .flags = HL_QUANTITY_ASSUMED,
    DEFAULT (0.70, COMMON_PRACTICE), RANGE (0.50, 0.85), LIMITS_EFFICIENCY, .yield_rank = 52,
    .help = N_("Enthalpy rise at constant entropy over the enthalpy rise.") },
  { .key = "temperature_rise", .sign = "ΔT", .name = N_("Temperature rise"), .group = N_("Delivery"),
    .dimension = HL_DIMENSION_TEMPERATURE_DIFFERENCE, .flags = HL_QUANTITY_RESULT, NO_DEFAULT, NO_RANGE, LIMITS (-1000.0, 1000.0),
    .help = N_("By how much the gas warms up in the fan.") },
  { .key = "motor_efficiency", .sign = "η_m", .name = N_("Motor efficiency"), .group = N_("Power"),
    .dimension = HL_DIMENSION_RATIO, .flags = HL_QUANTITY_ASSUMED,
    DEFAULT (0.95, N_("common practice, no source; motor classes: IEC 60034-30-1")), RANGE (0.85, 0.97), LIMITS_EFFICIENCY, .yield_rank = 82,
    .help = N_("Shaft power over electrical power; not used where a shaft drives the fan.") },
  { .key = "power", .sign = "P", .name = N_("Shaft power"), .group = N_("Power"),
    .dimension = HL_DIMENSION_POWER, .flags = HL_QUANTITY_RESULT, NO_DEFAULT, NO_RANGE, LIMITS_POWER,
    .help = N_("Power that the fan takes at its shaft.") },
  { .key = "motor_power", .sign = "P_el", .name = N_("Motor power"), .group = N_("Power"),
    .dimension = HL_DIMENSION_POWER, .flags = HL_QUANTITY_RESULT, NO_DEFAULT, NO_RANGE, LIMITS_POWER,
    .help = N_("Electrical power of the motor; 0 where a shaft drives the fan.") },
};

const HlKind hl_kind_fan = {
  .id = "fan", .letter = "F", .name = N_("Fan"), .shelf_name = N_("fan"), .shelf_group = N_("Gas path"),
  .help = N_("Moves air or flue gas; driven by a motor unless it sits on a shaft."),
  .shaft = HL_SHAFT_DRIVEN, .half_width = 2, .half_height = 2,
  .ports = ROWS (fan_ports), .quantities = ROWS (fan_quantities),
};
