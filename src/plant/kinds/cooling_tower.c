/* Wet cooling tower.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "plant/kinds/site-air.h"

static const HlOptionKind options[] = { AIR_OPTION };

static const HlPortKind ports[] = {
  { .key = "water_inlet", .name = N_("warm water inlet"), .direction = HL_PORT_IN, .side = HL_SIDE_LEFT, .x = -3, .y = 0 },
  { .key = "water_outlet", .name = N_("cold water outlet"), .direction = HL_PORT_OUT, .side = HL_SIDE_DOWN, .x = 0, .y = 3 },
};

static const HlQuantityKind quantities[] = {
  { .key = "wet_bulb_T", .sign = "T", .name = N_("Wet bulb temperature"), .group = N_("Air"),
    .dimension = HL_DIMENSION_TEMPERATURE, .flags = HL_QUANTITY_ASSUMED,
    DEFAULT (285.15, N_("an example, no source: 12 °C; UFC 3-540-02N, 7.2.2: take the one seldom exceeded")), RANGE (263.15, 303.15),
    LIMITS_TEMPERATURE, .yield_rank = 90, .help = N_("Wet bulb temperature of the air that comes in."), WITH_OWN_AIR },
  { .key = "approach", .sign = "ΔT", .name = N_("Approach"), .group = N_("Cooling"),
    .dimension = HL_DIMENSION_TEMPERATURE_DIFFERENCE, .flags = HL_QUANTITY_ASSUMED | HL_QUANTITY_USUAL,
    DEFAULT (6.0, N_("common practice, no source: 3-10 K; about 2.5 K is the limit: ASHRAE Handbook, quoted from a secondary text")), RANGE (3.0, 10.0),
    LIMITS (-100.0, 500.0), .yield_rank = 10, .help = N_("Temperature of the cold water minus wet bulb temperature.") },
  { .key = "range", .sign = "ΔT", .name = N_("Range"), .group = N_("Cooling"),
    .dimension = HL_DIMENSION_TEMPERATURE_DIFFERENCE, .flags = HL_QUANTITY_RESULT, NO_DEFAULT, RANGE (6.0, 16.0), LIMITS_DIFFERENCE, .yield_rank = 20,
    .help = N_("By how much the water cools; the condenser's rise mostly decides it.") },
  { .key = "water_outlet.p", .sign = "p", .name = N_("Basin pressure"), .group = N_("Water"),
    .dimension = HL_DIMENSION_PRESSURE, .flags = HL_QUANTITY_ASSUMED | HL_QUANTITY_USUAL,
    DEFAULT (1.01325e5, N_("the standard atmosphere; the basin is open")), RANGE (0.7e5, 1.1e5), LIMITS_PRESSURE, .yield_rank = 94,
    .help = N_("Pressure of the water in the open basin; it sets the level of the water's circuit.") },
  { .key = "lift", .sign = "Δp", .name = N_("Lift and spray pressure"), .group = N_("Water"),
    .dimension = HL_DIMENSION_PRESSURE_DIFFERENCE, .flags = HL_QUANTITY_ASSUMED,
    DEFAULT (1e5, N_("a first guess, no source: ten metres of water")), RANGE (0.3e5, 2.5e5), LIMITS (HL_FROM_ZERO, 1e8), .yield_rank = 93,
    .help = N_("Pressure at the warm water inlet above that of the basin: height and spray nozzles.") },
  { .key = "evaporation_fraction", .sign = "m/m", .name = N_("Evaporation of circulation"), .group = N_("Make-up"),
    .dimension = HL_DIMENSION_RATIO, .flags = HL_QUANTITY_ASSUMED | HL_QUANTITY_PERCENT,
    DEFAULT (0.016, N_("0.01 to 0.03, quoted from a secondary text")), RANGE (0.01, 0.03), LIMITS_FRACTION, .yield_rank = 60,
    .help = N_("Water evaporated over water circulating.") },
  { .key = "drift_fraction", .sign = "m/m", .name = N_("Drift of circulation"), .group = N_("Make-up"),
    .dimension = HL_DIMENSION_RATIO, .flags = HL_QUANTITY_ASSUMED | HL_QUANTITY_PERCENT,
    DEFAULT (0.00005, N_("quoted from a secondary text")), RANGE (0.0, 0.002), LIMITS_FRACTION, .yield_rank = 61,
    .help = N_("Droplets carried away over water circulating.") },
  { .key = "cycles", .sign = "c", .name = N_("Cycles of concentration"), .group = N_("Make-up"),
    .dimension = HL_DIMENSION_RATIO, .flags = HL_QUANTITY_ASSUMED,
    DEFAULT (4.0, N_("common practice, no source: 3-7, as the water's salts allow")), RANGE (2.0, 10.0), LIMITS (1.0, 1000.0), .yield_rank = 62,
    .help = N_("Salts of the circulating water over those of the make-up.") },
  { .key = "heat", .sign = "Q", .name = N_("Heat to air"), .group = N_("Result"),
    .dimension = HL_DIMENSION_POWER, .flags = HL_QUANTITY_RESULT, NO_DEFAULT, NO_RANGE, LIMITS_POWER,
    .help = N_("Heat that the water gives up; the plant's heat rejected counts it at the condenser.") },
  { .key = "evaporation", .sign = "m", .name = N_("Evaporation"), .group = N_("Result"),
    .dimension = HL_DIMENSION_MASS_FLOW, .flags = HL_QUANTITY_RESULT, NO_DEFAULT, NO_RANGE, LIMITS_FLOW, .help = N_("Water that evaporates.") },
  { .key = "drift", .sign = "m", .name = N_("Drift"), .group = N_("Result"),
    .dimension = HL_DIMENSION_MASS_FLOW, .flags = HL_QUANTITY_RESULT, NO_DEFAULT, NO_RANGE, LIMITS_FLOW, .help = N_("Droplets that the air carries away.") },
  { .key = "blowdown", .sign = "m", .name = N_("Blowdown"), .group = N_("Result"),
    .dimension = HL_DIMENSION_MASS_FLOW, .flags = HL_QUANTITY_RESULT, NO_DEFAULT, NO_RANGE, LIMITS_FLOW, .help = N_("Water let off to keep the salts down.") },
  { .key = "make_up_flow", .sign = "m", .name = N_("Make-up flow"), .group = N_("Result"),
    .dimension = HL_DIMENSION_MASS_FLOW, .flags = HL_QUANTITY_RESULT, NO_DEFAULT, NO_RANGE, LIMITS_FLOW,
    .help = N_("Evaporation, drift and blowdown together; it is added at the state of the basin.") },
};

const HlKind hl_kind_cooling_tower = {
  .id = "cooling_tower", .letter = "CT", .name = N_("Cooling tower"), .shelf_name = N_("cooling tower"), .shelf_group = N_("Condense"),
  .help = N_("Cools the condenser's water by evaporation, towards the wet bulb temperature."),
  .half_width = 3, .half_height = 3,
  .ports = ROWS (ports), .options = ROWS (options), .quantities = ROWS (quantities),
};
