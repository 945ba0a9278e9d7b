/* District heater: steam condenses against the water of a heating network.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "plant/kinds/kinds.h"

static const HlPortKind ports[] = {
  { .key = "steam", .name = N_("heating steam inlet"), .direction = HL_PORT_IN, .side = HL_SIDE_UP, .x = 0, .y = -2 },
  { .key = "drain", .name = N_("drain outlet"), .direction = HL_PORT_OUT, .side = HL_SIDE_DOWN, .x = 0, .y = 2 },
  { .key = "drain_inlet", .name = N_("drain inlet"), .direction = HL_PORT_IN, .side = HL_SIDE_LEFT, .x = -2, .y = -1, .is_optional = TRUE },
  { .key = "water_inlet", .name = N_("district water inlet"), .direction = HL_PORT_IN, .side = HL_SIDE_RIGHT, .x = 2, .y = 1,
    .side_circuit = 1, .is_optional = TRUE },
  { .key = "water_outlet", .name = N_("district water outlet"), .direction = HL_PORT_OUT, .side = HL_SIDE_RIGHT, .x = 2, .y = -1,
    .side_circuit = 1, .is_optional = TRUE },
};

static const HlQuantityKind quantities[] = {
  { .key = "heat", .sign = "Q", .name = N_("Heat delivered"), .group = N_("Duty"),
    .dimension = HL_DIMENSION_POWER, .flags = HL_QUANTITY_USUAL | HL_QUANTITY_RESULT,
    DEFAULT (5e6, N_("an example size, no source")), NO_RANGE, LIMITS_POWER, .yield_rank = 20,
    .help = N_("Heat that the district water takes up.") },
  { .key = "return_T", .sign = "T", .name = N_("Return temperature"), .group = N_("District water"),
    .dimension = HL_DIMENSION_TEMPERATURE, .flags = HL_QUANTITY_ASSUMED,
    DEFAULT (328.15, N_("an example, no source: 55 °C; ask the network")), RANGE (293.15, 363.15), LIMITS_TEMPERATURE, .yield_rank = 70,
    .help = N_("Temperature of the district water as it comes back from the network.") },
  { .key = "flow_T", .sign = "T", .name = N_("Flow temperature"), .group = N_("District water"),
    .dimension = HL_DIMENSION_TEMPERATURE, .flags = HL_QUANTITY_USUAL | HL_QUANTITY_ASSUMED,
    DEFAULT (368.15, N_("an example, no source: 95 °C; ask the network")), RANGE (323.15, 453.15), LIMITS_TEMPERATURE, .yield_rank = 40,
    .help = N_("Temperature of the district water as it goes out to the network.") },
  { .key = "terminal_difference", .sign = "TTD", .name = N_("Terminal temperature difference"), .group = N_("Heat transfer"),
    .dimension = HL_DIMENSION_TEMPERATURE_DIFFERENCE, .flags = HL_QUANTITY_ASSUMED,
    DEFAULT (4.0, N_("common practice, no source: as in condensers, 3-8 K")), RANGE (2.0, 10.0), LIMITS (-100.0, 500.0), .yield_rank = 10,
    .help = N_("Saturation temperature of the steam minus flow temperature.") },
  { .key = "drain_subcooling", .sign = "ΔT", .name = N_("Drain subcooling"), .group = N_("Heat transfer"),
    .dimension = HL_DIMENSION_TEMPERATURE_DIFFERENCE, .flags = HL_QUANTITY_ASSUMED,
    DEFAULT (0.0, N_("simplification, no source: the drain leaves saturated")), RANGE (0.0, 50.0), LIMITS_DIFFERENCE, .yield_rank = 45,
    .help = N_("How far the drain leaves below saturation.") },
  { .key = "steam.p", .sign = "p", .name = N_("Steam pressure"), .group = N_("Steam"),
    .dimension = HL_DIMENSION_PRESSURE, .flags = HL_QUANTITY_USUAL, NO_DEFAULT, RANGE (0.2e5, 10e5), LIMITS_PRESSURE, .yield_rank = 15,
    .help = N_("Pressure of the condensing steam; it follows from flow temperature and terminal difference.") },
  { .key = "water_p", .sign = "p", .name = N_("District water pressure"), .group = N_("District water"),
    .dimension = HL_DIMENSION_PRESSURE, .flags = HL_QUANTITY_ASSUMED,
    DEFAULT (8e5, N_("an example, no source: enough to keep the water from boiling")), RANGE (2e5, 25e5), LIMITS_PRESSURE, .yield_rank = 92,
    .help = N_("Pressure of the district water at its inlet.") },
  { .key = "water_pressure_loss", .sign = "Δp/p", .name = N_("District water pressure loss"), .group = N_("District water"),
    .dimension = HL_DIMENSION_RATIO, .flags = HL_QUANTITY_ASSUMED | HL_QUANTITY_PERCENT,
    DEFAULT (0.0, N_("simplification, no source: no pressure is lost")), RANGE (0.0, 0.3), LIMITS_LOSS, .yield_rank = 91,
    .help = N_("Pressure lost by the district water as a part of its inlet pressure.") },
  { .key = "water_flow", .sign = "m", .name = N_("District water flow"), .group = N_("Result"),
    .dimension = HL_DIMENSION_MASS_FLOW, .flags = HL_QUANTITY_RESULT, NO_DEFAULT, NO_RANGE, LIMITS_FLOW,
    .help = N_("Mass flow of the district water.") },
  { .key = "UA", .sign = "UA", .name = N_("Conductance"), .group = N_("Result"),
    .dimension = HL_DIMENSION_CONDUCTANCE, .flags = HL_QUANTITY_RESULT, NO_DEFAULT, NO_RANGE, LIMITS_CONDUCTANCE,
    .help = N_("Heat transfer coefficient times area, summed over desuperheating, condensing and drain cooling zones.") },
  ELEVATION
};

static const HlRating ratings[] = { { .frozen = "UA", .found = "terminal_difference" } };

const HlKind hl_kind_district_heater = {
  .id = "district_heater", .letter = "DH", .name = N_("District heater"), .shelf_name = N_("district heater"), .shelf_group = N_("Duty"),
  .help = N_("Warms the water of a heating network with condensing steam; the water is counted inside or comes through its own lines."),
  .half_width = 2, .half_height = 2,
  .ports = ROWS (ports), .quantities = ROWS (quantities), .ratings = ROWS (ratings),
};
