/* Air-cooled condenser.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "plant/kinds/site-air.h"

static const HlOptionKind options[] = { AIR_OPTION };

static const HlPortKind ports[] = {
  { .key = "steam", .name = N_("steam inlet"), .direction = HL_PORT_IN, .side = HL_SIDE_UP, .x = 0, .y = -3 },
  { .key = "drain", .name = N_("drain inlet"), .direction = HL_PORT_IN, .side = HL_SIDE_LEFT, .x = -3, .y = 0, .is_optional = TRUE },
  { .key = "condensate", .name = N_("condensate outlet"), .direction = HL_PORT_OUT, .side = HL_SIDE_RIGHT, .x = 3, .y = 0 },
};

static const HlQuantityKind quantities[] = {
  { .key = "steam.p", .sign = "p", .name = N_("Condenser pressure"), .group = N_("Steam"),
    .dimension = HL_DIMENSION_PRESSURE, .flags = HL_QUANTITY_USUAL, NO_DEFAULT, RANGE (4000.0, 50000.0), LIMITS_PRESSURE, .yield_rank = 15,
    .help = N_("Pressure at the steam inlet; it follows from the air and the initial difference.") },
  { .key = "subcooling", .sign = "ΔT", .name = N_("Condensate subcooling"), .group = N_("Steam"),
    .dimension = HL_DIMENSION_TEMPERATURE_DIFFERENCE, .flags = HL_QUANTITY_ASSUMED,
    DEFAULT (0.0, N_("simplification, no source: condensate leaves saturated")), RANGE (0.0, 10.0), LIMITS_DIFFERENCE, .yield_rank = 45,
    .help = N_("How far the condensate leaves below saturation.") },
  { .key = "ambient_T", .sign = "T", .name = N_("Air temperature"), .group = N_("Air"),
    .dimension = HL_DIMENSION_TEMPERATURE, .flags = HL_QUANTITY_ASSUMED,
    DEFAULT (288.15, N_("an example, no source: 15 °C")), RANGE (243.15, 323.15), LIMITS_TEMPERATURE, .yield_rank = 90,
    .help = N_("Temperature of the air that comes in."), WITH_OWN_AIR },
  { .key = "initial_difference", .sign = "ITD", .name = N_("Initial temperature difference"), .group = N_("Air"),
    .dimension = HL_DIMENSION_TEMPERATURE_DIFFERENCE, .flags = HL_QUANTITY_ASSUMED | HL_QUANTITY_USUAL,
    DEFAULT (25.0, N_("common practice, no source: steam 15-35 K, organic vapours 12-25 K")), RANGE (12.0, 35.0), LIMITS (-100.0, 500.0), .yield_rank = 10,
    .help = N_("Saturation temperature of the steam minus temperature of the air that comes in.") },
  { .key = "conductance", .sign = "Q/ITD", .name = N_("Heat per initial difference"), .group = N_("Heat transfer"),
    .dimension = HL_DIMENSION_CONDUCTANCE, .flags = HL_QUANTITY_RESULT, NO_DEFAULT, NO_RANGE, LIMITS_CONDUCTANCE, .yield_rank = 25,
    .help = N_("Size of the condenser with its fans: heat over saturation temperature minus air temperature.") },
  { .key = "fan_fraction", .sign = "P/P", .name = N_("Fan power of gross"), .group = N_("Fans"),
    .dimension = HL_DIMENSION_RATIO, .flags = HL_QUANTITY_ASSUMED | HL_QUANTITY_PERCENT,
    DEFAULT (0.015, N_("common practice, no source: steam 0.7-2.5 % of gross, binary plants 6-15 %")), RANGE (0.005, 0.15), LIMITS_FRACTION, .yield_rank = 85,
    .help = N_("Electrical power of the fans over gross power of the plant.") },
  { .key = "fan_power", .sign = "P_el", .name = N_("Fan power"), .group = N_("Fans"),
    .dimension = HL_DIMENSION_POWER, .flags = HL_QUANTITY_RESULT, NO_DEFAULT, NO_RANGE, LIMITS_POWER,
    .help = N_("Electrical power of the fans; part of own consumption.") },
  { .key = "heat", .sign = "Q", .name = N_("Heat rejected"), .group = N_("Result"),
    .dimension = HL_DIMENSION_POWER, .flags = HL_QUANTITY_RESULT, NO_DEFAULT, NO_RANGE, LIMITS_POWER,
    .help = N_("Heat that leaves the steam side.") },
  ELEVATION
};

static const HlRating ratings[] = { { .frozen = "conductance", .found = "initial_difference" } };

const HlKind hl_kind_air_condenser = {
  .id = "air_condenser", .letter = "AC", .name = N_("Air-cooled condenser"), .shelf_name = N_("air condenser"), .shelf_group = N_("Condense"),
  .help = N_("Condenses exhaust steam in finned tubes that fans blow air through."),
  .half_width = 3, .half_height = 3,
  .ports = ROWS (ports), .options = ROWS (options), .quantities = ROWS (quantities), .ratings = ROWS (ratings),
};
