/* Control stage: the first stage behind the control valves.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "plant/kinds/kinds.h"

static const HlPortKind ports[] = {
  { .key = "inlet", .name = N_("steam inlet"), .direction = HL_PORT_IN, .side = HL_SIDE_UP, .x = -1, .y = -1 },
  { .key = "exhaust", .name = N_("exhaust"), .direction = HL_PORT_OUT, .side = HL_SIDE_DOWN, .x = 1, .y = 2 },
};

static const HlQuantityKind quantities[] = {
  { .key = "inlet.p", .sign = "p", .name = N_("Inlet pressure"), .group = N_("Steam"),
    .dimension = HL_DIMENSION_PRESSURE, .flags = HL_QUANTITY_USUAL | HL_QUANTITY_ASSUMED,
    DEFAULT (65e5, N_("common practice, no source: industrial sets run at 40 to 100 bar")),
    RANGE (5e5, 300e5), LIMITS_PRESSURE, .yield_rank = 30,
    .help = N_("Pressure of the steam behind the control valves.") },
  { .key = "pressure_ratio", .sign = "p/p", .name = N_("Pressure ratio"), .group = N_("Steam"),
    .dimension = HL_DIMENSION_RATIO, .flags = HL_QUANTITY_ASSUMED | HL_QUANTITY_USUAL,
    DEFAULT (0.75, N_("a first guess, no source: the maker decides")), RANGE (0.45, 0.9), LIMITS (0.0, 1.0), .yield_rank = 25,
    .help = N_("Exhaust over inlet pressure. A plain balance: no formula for partial admission is used, ratio and efficiency are given.") },
  { .key = "exhaust.p", .sign = "p", .name = N_("Wheel chamber pressure"), .group = N_("Steam"),
    .dimension = HL_DIMENSION_PRESSURE, .flags = HL_QUANTITY_RESULT,
    NO_DEFAULT, NO_RANGE, LIMITS_PRESSURE, .yield_rank = 20,
    .help = N_("Pressure behind the stage, where the next section takes the steam.") },
  { .key = "isentropic_efficiency", .sign = "η", .name = N_("Isentropic efficiency"), .group = N_("Expansion"),
    .dimension = HL_DIMENSION_RATIO, .flags = HL_QUANTITY_ASSUMED,
    DEFAULT (0.65, N_("a first guess, no source: the maker decides")),
    RANGE (0.45, 0.82), LIMITS_EFFICIENCY, .yield_rank = 50,
    .help = N_("Enthalpy drop over the drop at constant entropy.") },
  { .key = "flow_constant1", .sign = "K", .name = N_("Flow constant"), .group = N_("Size"),
    .dimension = HL_DIMENSION_AREA, .flags = HL_QUANTITY_RESULT, NO_DEFAULT, NO_RANGE, LIMITS (0.0, 1e6), .yield_rank = 58,
    .help = N_("Size by the ellipse law: flow over √((p1² - p2²)/(p1 v1)); given, it finds the pressure before it.") },
  { .key = "mechanical_efficiency", .sign = "η_m", .name = N_("Mechanical efficiency"), .group = N_("Power"),
    .dimension = HL_DIMENSION_RATIO, .flags = HL_QUANTITY_ASSUMED,
    DEFAULT (0.985, N_("Dixon and Hall, quoted from a secondary text: 0.95 for a few kW to 0.99 for large sets")),
    RANGE (0.94, 0.998), LIMITS_EFFICIENCY, .yield_rank = 80,
    .help = N_("Shaft power over internal power: bearings and seals.") },
  { .key = "exhaust_moisture", .sign = "y", .name = N_("Exhaust moisture"), .group = N_("Expansion"),
    .dimension = HL_DIMENSION_RATIO, .flags = HL_QUANTITY_RESULT | HL_QUANTITY_PERCENT, NO_DEFAULT, RANGE (0.0, 0.12), LIMITS_FRACTION,
    .help = N_("Liquid mass fraction at the exhaust: 1 - x where it is wet, otherwise 0.") },
  { .key = "internal_power", .sign = "P_i", .name = N_("Internal power"), .group = N_("Power"),
    .dimension = HL_DIMENSION_POWER, .flags = HL_QUANTITY_RESULT, NO_DEFAULT, NO_RANGE, LIMITS_POWER,
    .help = N_("Power that the steam gives to the rotor.") },
  { .key = "power", .sign = "P", .name = N_("Shaft power"), .group = N_("Power"),
    .dimension = HL_DIMENSION_POWER, .flags = HL_QUANTITY_RESULT, NO_DEFAULT, NO_RANGE, LIMITS_POWER,
    .help = N_("Internal power times mechanical efficiency.") },
};

static const HlRating ratings[] = { { .frozen = "flow_constant1", .found = "pressure_ratio" } };

const HlKind hl_kind_control_stage = {
  .id = "control_stage", .letter = "CS", .name = N_("Control stage"), .shelf_name = N_("control stage"), .shelf_group = N_("Expand"),
  .help = N_("The stage behind the control valves, by given pressure ratio and efficiency; the section behind it shares its shaft."),
  .shaft = HL_SHAFT_DRIVES, .half_width = 1, .half_height = 2,
  .ports = ROWS (ports), .quantities = ROWS (quantities), .ratings = ROWS (ratings),
};
