/* Feed pump turbine: drives a pump with steam from an extraction.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "plant/kinds/kinds.h"

static const HlPortKind ports[] = {
  { .key = "inlet", .name = N_("steam inlet"), .direction = HL_PORT_IN, .side = HL_SIDE_UP, .x = -2, .y = -1 },
  { .key = "exhaust", .name = N_("exhaust"), .direction = HL_PORT_OUT, .side = HL_SIDE_DOWN, .x = 2, .y = 2 },
};

static const HlQuantityKind quantities[] = {
  { .key = "inlet.p", .sign = "p", .name = N_("Inlet pressure"), .group = N_("Steam"),
    .dimension = HL_DIMENSION_PRESSURE, .flags = HL_QUANTITY_USUAL,
    NO_DEFAULT, RANGE (2e5, 60e5), LIMITS_PRESSURE, .yield_rank = 30,
    .help = N_("Pressure at the turbine flange; mostly the extraction before it decides it.") },
  { .key = "exhaust.p", .sign = "p", .name = N_("Exhaust pressure"), .group = N_("Steam"),
    .dimension = HL_DIMENSION_PRESSURE, .flags = HL_QUANTITY_USUAL,
    NO_DEFAULT, RANGE (3000.0, 12e5), LIMITS_PRESSURE, .yield_rank = 20,
    .help = N_("Pressure at the exhaust flange, mostly a little above that of the condenser.") },
  { .key = "isentropic_efficiency", .sign = "η", .name = N_("Isentropic efficiency"), .group = N_("Expansion"),
    .dimension = HL_DIMENSION_RATIO, .flags = HL_QUANTITY_ASSUMED,
    DEFAULT (0.80, N_("common practice, no source: feed pump turbines 0.72-0.84")),
    RANGE (0.72, 0.84), LIMITS_EFFICIENCY, .yield_rank = 50,
    .help = N_("Enthalpy drop over the drop at constant entropy.") },
  { .key = "flow_constant1", .sign = "K", .name = N_("Flow constant"), .group = N_("Size"),
    .dimension = HL_DIMENSION_AREA, .flags = HL_QUANTITY_RESULT, NO_DEFAULT, NO_RANGE, LIMITS (0.0, 1e6), .yield_rank = 58,
    .help = N_("Size by the ellipse law: flow over √((p1² - p2²)/(p1 v1)); given, it finds the pressure before it.") },
  { .key = "mechanical_efficiency", .sign = "η_m", .name = N_("Mechanical efficiency"), .group = N_("Power"),
    .dimension = HL_DIMENSION_RATIO, .flags = HL_QUANTITY_ASSUMED,
    DEFAULT (0.985, N_("Dixon and Hall, quoted from a secondary text: 0.95 for a few kW to 0.99 for large sets")),
    RANGE (0.94, 0.998), LIMITS_EFFICIENCY, .yield_rank = 80,
    .help = N_("Shaft power over internal power: bearings and seals.") },
  { .key = "exhaust.x", .sign = "x", .name = N_("Exhaust quality"), .group = N_("Expansion"),
    .dimension = HL_DIMENSION_RATIO, .flags = HL_QUANTITY_RESULT, NO_DEFAULT, NO_RANGE, LIMITS_FRACTION,
    .help = N_("Vapour mass fraction at the exhaust; none where the exhaust is superheated.") },
  { .key = "exhaust_moisture", .sign = "y", .name = N_("Exhaust moisture"), .group = N_("Expansion"),
    .dimension = HL_DIMENSION_RATIO, .flags = HL_QUANTITY_RESULT | HL_QUANTITY_PERCENT, NO_DEFAULT, RANGE (0.0, 0.12), LIMITS_FRACTION,
    .help = N_("Liquid mass fraction at the exhaust: 1 - x where it is wet, otherwise 0.") },
  { .key = "inlet.m", .sign = "m", .name = N_("Steam flow"), .group = N_("Steam"),
    .dimension = HL_DIMENSION_MASS_FLOW, .flags = HL_QUANTITY_RESULT, NO_DEFAULT, NO_RANGE, LIMITS_FLOW,
    .help = N_("Steam that it takes to drive what is on its shaft.") },
  { .key = "internal_power", .sign = "P_i", .name = N_("Internal power"), .group = N_("Power"),
    .dimension = HL_DIMENSION_POWER, .flags = HL_QUANTITY_RESULT, NO_DEFAULT, NO_RANGE, LIMITS_POWER,
    .help = N_("Power that the steam gives to the rotor.") },
  { .key = "power", .sign = "P", .name = N_("Shaft power"), .group = N_("Power"),
    .dimension = HL_DIMENSION_POWER, .flags = HL_QUANTITY_RESULT, NO_DEFAULT, NO_RANGE, LIMITS_POWER,
    .help = N_("Power that it gives to its shaft: what the pump takes.") },
};

static const HlRating ratings[] = { { .frozen = "flow_constant1", .found = "inlet.p" } };

const HlKind hl_kind_feed_pump_turbine = {
  .id = "feed_pump_turbine", .letter = "FT", .name = N_("Feed pump turbine"), .shelf_name = N_("feed pump turbine"), .shelf_group = N_("Feed"),
  .help = N_("Drives a feed pump with steam, mostly from an extraction; as much flows in as the pump takes."),
  .shaft = HL_SHAFT_DRIVES, .only_drives = TRUE, .half_width = 2, .half_height = 2,
  .ports = ROWS (ports), .quantities = ROWS (quantities), .ratings = ROWS (ratings),
};
