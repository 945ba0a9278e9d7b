/* Steam air heater: condensing steam warms air.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "plant/kinds/bank.h"

static const HlPortKind ports[] = {
  { .key = "air_inlet", .name = N_("air inlet"), .direction = HL_PORT_IN, .side = HL_SIDE_LEFT, .x = -2, .y = 0, .side_circuit = 1, .medium = "air" },
  { .key = "air_outlet", .name = N_("air outlet"), .direction = HL_PORT_OUT, .side = HL_SIDE_RIGHT, .x = 2, .y = 0, .side_circuit = 1, .medium = "air" },
  { .key = "steam", .name = N_("steam inlet"), .direction = HL_PORT_IN, .side = HL_SIDE_UP, .x = 0, .y = -2 },
  { .key = "drain", .name = N_("drain outlet"), .direction = HL_PORT_OUT, .side = HL_SIDE_DOWN, .x = 0, .y = 2 },
};

static const HlQuantityKind quantities[] = {
  { .key = "terminal_difference", .sign = "TTD", .name = N_("Terminal temperature difference"), .group = N_("Heat transfer"),
    .dimension = HL_DIMENSION_TEMPERATURE_DIFFERENCE, .flags = HL_QUANTITY_ASSUMED | HL_QUANTITY_USUAL,
    DEFAULT (30.0, N_("common practice, no source: 15-60 K")), RANGE (10.0, 150.0), LIMITS (-1000.0, 1000.0), .yield_rank = 10,
    .help = N_("Saturation temperature of the steam minus air outlet temperature.") },
  { .key = "air_outlet.T", .sign = "T", .name = N_("Air outlet temperature"), .group = N_("Heat transfer"),
    .dimension = HL_DIMENSION_TEMPERATURE, .flags = HL_QUANTITY_RESULT | HL_QUANTITY_USUAL, NO_DEFAULT, NO_RANGE, LIMITS_TEMPERATURE, .yield_rank = 12,
    .help = N_("Temperature of the air as it leaves; another way to say the difference.") },
  { .key = "drain_subcooling", .sign = "ΔT", .name = N_("Drain subcooling"), .group = N_("Heat transfer"),
    .dimension = HL_DIMENSION_TEMPERATURE_DIFFERENCE, .flags = HL_QUANTITY_ASSUMED,
    DEFAULT (0.0, N_("simplification, no source: the drain leaves saturated")), RANGE (0.0, 40.0), LIMITS_DIFFERENCE, .yield_rank = 45,
    .help = N_("How far the drain leaves below saturation.") },
  LEAST_ROW,
  { .key = "air_pressure_loss", .sign = "Δp/p", .name = N_("Air pressure loss"), .group = N_("Losses"),
    .dimension = HL_DIMENSION_RATIO, .flags = HL_QUANTITY_ASSUMED | HL_QUANTITY_PERCENT,
    DEFAULT (0.005, N_("common practice, no source: 3-10 mbar")), RANGE (0.0, 0.03), LIMITS_LOSS, .yield_rank = 62,
    .help = N_("Pressure lost by the air as a part of its inlet pressure.") },
  BANK_RESULT_ROWS,
};

const HlKind hl_kind_steam_air_heater = {
  .id = "steam_air_heater", .letter = "SA", .name = N_("Steam air heater"), .shelf_name = N_("steam air heater"), .shelf_group = N_("Gas path"),
  .help = N_("Warms combustion air by condensing steam, in front of an air preheater for instance."),
  .half_width = 2, .half_height = 2,
  .ports = ROWS (ports), .quantities = ROWS (quantities),
};
