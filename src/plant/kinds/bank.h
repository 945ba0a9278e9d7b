/* Rows that heating surfaces on a gas path share: gas from left to right, what it heats from below to above.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#pragma once
#include "plant/kinds/kinds.h"

#define FLUE_GAS "flue-gas"

#define GAS_PORTS \
  { .key = "gas_inlet", .name = N_("gas inlet"), .direction = HL_PORT_IN, .side = HL_SIDE_LEFT, .x = -2, .y = 0, .side_circuit = 1, .medium = FLUE_GAS }, \
  { .key = "gas_outlet", .name = N_("gas outlet"), .direction = HL_PORT_OUT, .side = HL_SIDE_RIGHT, .x = 2, .y = 0, .side_circuit = 1, .medium = FLUE_GAS }

#define COIL_PORTS \
  { .key = "inlet", .name = N_("inlet"), .direction = HL_PORT_IN, .side = HL_SIDE_DOWN, .x = 0, .y = 2 }, \
  { .key = "outlet", .name = N_("outlet"), .direction = HL_PORT_OUT, .side = HL_SIDE_UP, .x = 0, .y = -2 }

#define AIR_PORTS \
  { .key = "air_inlet", .name = N_("air inlet"), .direction = HL_PORT_IN, .side = HL_SIDE_DOWN, .x = 0, .y = 2, .medium = "air" }, \
  { .key = "air_outlet", .name = N_("air outlet"), .direction = HL_PORT_OUT, .side = HL_SIDE_UP, .x = 0, .y = -2, .medium = "air" }

#define GAS_OUTLET_ROW \
  { .key = "gas_outlet.T", .sign = "T", .name = N_("Gas outlet temperature"), .group = N_("Heat transfer"), \
    .dimension = HL_DIMENSION_TEMPERATURE, .flags = HL_QUANTITY_RESULT, NO_DEFAULT, NO_RANGE, LIMITS_TEMPERATURE, .yield_rank = 15, \
    .help = N_("Temperature of the gas behind this heating surface.") }

#define COLD_END_ROW \
  { .key = "cold_end_difference", .sign = "ΔT", .name = N_("Cold end difference"), .group = N_("Heat transfer"), \
    .dimension = HL_DIMENSION_TEMPERATURE_DIFFERENCE, .flags = HL_QUANTITY_RESULT, NO_DEFAULT, NO_RANGE, LIMITS (-1000.0, 3000.0), .yield_rank = 16, \
    .help = N_("Gas outlet temperature minus the temperature of what comes in to be heated.") }

#define HOT_END_RESULT_ROW \
  { .key = "hot_end_difference", .sign = "ΔT", .name = N_("Hot end difference"), .group = N_("Heat transfer"), \
    .dimension = HL_DIMENSION_TEMPERATURE_DIFFERENCE, .flags = HL_QUANTITY_RESULT, NO_DEFAULT, NO_RANGE, LIMITS (-1000.0, 3000.0), .yield_rank = 16, \
    .help = N_("Gas inlet temperature minus the temperature of what leaves heated.") }

#define HOT_END_ROW(value, source, low, high) \
  { .key = "hot_end_difference", .sign = "ΔT", .name = N_("Hot end difference"), .group = N_("Heat transfer"), \
    .dimension = HL_DIMENSION_TEMPERATURE_DIFFERENCE, .flags = HL_QUANTITY_ASSUMED | HL_QUANTITY_USUAL, \
    DEFAULT (value, source), RANGE (low, high), LIMITS (-1000.0, 3000.0), .yield_rank = 10, \
    .help = N_("Gas inlet temperature minus the temperature of what leaves heated.") }

#define LEAST_ROW \
  { .key = "pinch", .sign = "ΔT_min", .name = N_("Least difference"), .group = N_("Heat transfer"), \
    .dimension = HL_DIMENSION_TEMPERATURE_DIFFERENCE, .flags = HL_QUANTITY_RESULT, NO_DEFAULT, NO_RANGE, LIMITS (-1000.0, 3000.0), .yield_rank = 11, \
    .help = N_("Least temperature difference between the two sides, wherever it lies.") }

#define BANK_RESULT_ROWS \
  { .key = "heat", .sign = "Q", .name = N_("Heat transferred"), .group = N_("Result"), \
    .dimension = HL_DIMENSION_POWER, .flags = HL_QUANTITY_RESULT, NO_DEFAULT, NO_RANGE, LIMITS_POWER, .yield_rank = 18, \
    .help = N_("Heat that reaches what is heated: what the gas gives less the loss.") }, \
  { .key = "UA", .sign = "UA", .name = N_("Conductance"), .group = N_("Result"), \
    .dimension = HL_DIMENSION_CONDUCTANCE, .flags = HL_QUANTITY_RESULT, NO_DEFAULT, NO_RANGE, LIMITS_CONDUCTANCE, .yield_rank = 19, \
    .help = N_("Heat transfer coefficient times area, summed over 24 parts of equal heat, cut again where a stream begins or ends to boil or condense.") }

#define GAS_LOSS_ROWS(the_loss, the_source) \
  { .key = "gas_pressure_loss", .sign = "Δp/p", .name = N_("Gas pressure loss"), .group = N_("Losses"), \
    .dimension = HL_DIMENSION_RATIO, .flags = HL_QUANTITY_ASSUMED | HL_QUANTITY_PERCENT, \
    DEFAULT (the_loss, the_source), RANGE (0.0, 0.03), LIMITS_LOSS, .yield_rank = 60, \
    .help = N_("Pressure lost by the gas as a part of its inlet pressure.") }, \
  { .key = "heat_loss_fraction", .sign = "Q/Q", .name = N_("Heat loss of gas heat"), .group = N_("Losses"), \
    .dimension = HL_DIMENSION_RATIO, .flags = HL_QUANTITY_ASSUMED | HL_QUANTITY_PERCENT, \
    DEFAULT (0.01, N_("Ganapathy, quoted from a secondary text: 0.5-2 %")), RANGE (0.0, 0.02), LIMITS_LOSS, .yield_rank = 61, \
    .help = N_("Part of the heat given by the gas that the casing loses to the surroundings.") }, \
  { .key = "heat_loss", .sign = "Q", .name = N_("Heat loss"), .group = N_("Losses"), \
    .dimension = HL_DIMENSION_POWER, .flags = HL_QUANTITY_RESULT, NO_DEFAULT, NO_RANGE, LIMITS_POWER, \
    .help = N_("Heat that the casing loses.") }

#define DRAUGHT N_("common practice, no source: 25-35 mbar over all surfaces of a heat-recovery boiler")

#define COLD_LOSS_ROW(value, source) \
  { .key = "pressure_loss", .sign = "Δp/p", .name = N_("Pressure loss"), .group = N_("Losses"), \
    .dimension = HL_DIMENSION_RATIO, .flags = HL_QUANTITY_ASSUMED | HL_QUANTITY_PERCENT, \
    DEFAULT (value, source), RANGE (0.0, 0.15), LIMITS_LOSS, .yield_rank = 62, \
    .help = N_("Pressure lost by what is heated as a part of its inlet pressure.") }

#define OUTLET_T_ROW(the_name) \
  { .key = "outlet.T", .sign = "T", .name = the_name, .group = N_("Heat transfer"), \
    .dimension = HL_DIMENSION_TEMPERATURE, .flags = HL_QUANTITY_RESULT | HL_QUANTITY_USUAL, NO_DEFAULT, NO_RANGE, LIMITS_TEMPERATURE, .yield_rank = 12, \
    .help = N_("Temperature of what leaves heated; another way to say the difference.") }
