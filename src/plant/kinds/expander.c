/* Organic expander: turbine, screw or scroll for vapours other than steam.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "plant/kinds/kinds.h"

static const HlPortKind ports[] = {
  { .key = "inlet", .name = N_("vapour inlet"), .direction = HL_PORT_IN, .side = HL_SIDE_UP, .x = 0, .y = -1, .anchor = HL_ANCHOR_LEFT_EDGE },
  { .key = "exhaust", .name = N_("exhaust"), .direction = HL_PORT_OUT, .side = HL_SIDE_DOWN, .x = 0, .y = 2, .anchor = HL_ANCHOR_RIGHT_EDGE },
};

static const HlQuantityKind quantities[] = {
  { .key = "inlet.p", .sign = "p", .name = N_("Inlet pressure"), .group = N_("Vapour"),
    .dimension = HL_DIMENSION_PRESSURE, .flags = HL_QUANTITY_USUAL | HL_QUANTITY_ASSUMED,
    DEFAULT (10e5, N_("an example, no source: organic cycles evaporate at 5 to 30 bar")), RANGE (1e5, 300e5), LIMITS_PRESSURE, .yield_rank = 30,
    .help = N_("Pressure of the vapour at the inlet flange.") },
  { .key = "exhaust.p", .sign = "p", .name = N_("Exhaust pressure"), .group = N_("Vapour"),
    .dimension = HL_DIMENSION_PRESSURE, .flags = HL_QUANTITY_USUAL, NO_DEFAULT, RANGE (1e3, 100e5), LIMITS_PRESSURE, .yield_rank = 20,
    .help = N_("Pressure at the exhaust flange; mostly the condenser decides it.") },
  { .key = "isentropic_efficiency", .sign = "η", .name = N_("Isentropic efficiency"), .group = N_("Expansion"),
    .dimension = HL_DIMENSION_RATIO, .flags = HL_QUANTITY_ASSUMED,
    DEFAULT (0.82, N_("common practice, no source: organic turbines above 0.5 MW; small radial ones about 0.75, screw and scroll 0.68; size and volume ratio decide (Astolfi and Macchi 2015)")),
    RANGE (0.50, 0.92), LIMITS_EFFICIENCY, .yield_rank = 50,
    .help = N_("Enthalpy drop over the drop at constant entropy.") },
  { .key = "mechanical_efficiency", .sign = "η_m", .name = N_("Mechanical efficiency"), .group = N_("Power"),
    .dimension = HL_DIMENSION_RATIO, .flags = HL_QUANTITY_ASSUMED,
    DEFAULT (0.985, N_("Dixon and Hall, quoted from a secondary text: 0.95 for a few kW to 0.99 for large sets")),
    RANGE (0.94, 0.998), LIMITS_EFFICIENCY, .yield_rank = 80,
    .help = N_("Shaft power over internal power: bearings and seals.") },
  { .key = "volume_ratio", .sign = "v/v", .name = N_("Volume ratio"), .group = N_("Expansion"),
    .dimension = HL_DIMENSION_RATIO, .flags = HL_QUANTITY_RESULT, NO_DEFAULT, NO_RANGE, LIMITS (0.0, 1e6), .yield_rank = 21,
    .help = N_("Volume at the exhaust over that at the inlet; the larger, the more stages are needed.") },
  { .key = "exhaust_moisture", .sign = "y", .name = N_("Exhaust moisture"), .group = N_("Expansion"),
    .dimension = HL_DIMENSION_RATIO, .flags = HL_QUANTITY_RESULT | HL_QUANTITY_PERCENT, NO_DEFAULT, RANGE (0.0, 0.12), LIMITS_FRACTION, .yield_rank = 22,
    .help = N_("Liquid mass fraction at the exhaust; 0 where it is dry, as with most organic vapours.") },
  { .key = "internal_power", .sign = "P_i", .name = N_("Internal power"), .group = N_("Power"),
    .dimension = HL_DIMENSION_POWER, .flags = HL_QUANTITY_RESULT, NO_DEFAULT, NO_RANGE, LIMITS_POWER,
    .help = N_("Power that the vapour gives to the rotor.") },
  { .key = "power", .sign = "P", .name = N_("Shaft power"), .group = N_("Power"),
    .dimension = HL_DIMENSION_POWER, .flags = HL_QUANTITY_RESULT, NO_DEFAULT, NO_RANGE, LIMITS_POWER,
    .help = N_("Internal power times mechanical efficiency.") },
};

const HlKind hl_kind_expander = {
  .id = "expander", .letter = "TX", .name = N_("Organic expander"), .shelf_name = N_("expander"), .shelf_group = N_("Expand"),
  .help = N_("Expands organic vapour, CO2 or ammonia and drives a shaft."),
  .shaft = HL_SHAFT_DRIVES, .half_width = 2, .half_height = 2,
  .ports = ROWS (ports), .quantities = ROWS (quantities),
};
