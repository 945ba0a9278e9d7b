/* Ejector: motive steam draws in another stream and carries it to a pressure between both.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "plant/kinds/kinds.h"

static const HlPortKind ports[] = {
  { .key = "motive", .name = N_("motive steam inlet"), .direction = HL_PORT_IN, .side = HL_SIDE_LEFT, .x = -3, .y = 0 },
  { .key = "suction", .name = N_("suction inlet"), .direction = HL_PORT_IN, .side = HL_SIDE_DOWN, .x = -1, .y = 2 },
  { .key = "outlet", .name = N_("outlet"), .direction = HL_PORT_OUT, .side = HL_SIDE_RIGHT, .x = 3, .y = 0 },
};

static const HlQuantityKind quantities[] = {
  { .key = "entrainment_ratio", .sign = "m/m", .name = N_("Entrainment ratio"), .group = N_("Ratios"),
    .dimension = HL_DIMENSION_RATIO, .flags = HL_QUANTITY_ASSUMED | HL_QUANTITY_USUAL,
    DEFAULT (0.3, N_("an example, no source: the maker's curve decides")), RANGE (0.05, 1.5), LIMITS (0.0, 100.0), .yield_rank = 30,
    .help = N_("Flow drawn in over motive flow. A plain balance: no formula for the jet is used, the ratio is the maker's.") },
  { .key = "outlet.p", .sign = "p", .name = N_("Outlet pressure"), .group = N_("Ratios"),
    .dimension = HL_DIMENSION_PRESSURE, .flags = HL_QUANTITY_USUAL,
    NO_DEFAULT, RANGE (0.03e5, 40e5), LIMITS_PRESSURE, .yield_rank = 20,
    .help = N_("Pressure at the outlet, between those of both inlets; mostly what lies behind decides it.") },
  { .key = "compression_ratio", .sign = "p/p", .name = N_("Compression ratio"), .group = N_("Ratios"),
    .dimension = HL_DIMENSION_RATIO, .flags = HL_QUANTITY_RESULT,
    NO_DEFAULT, RANGE (1.1, 10.0), LIMITS (0.0, 1e4), .yield_rank = 21,
    .help = N_("Outlet over suction pressure.") },
  { .key = "expansion_ratio", .sign = "p/p", .name = N_("Expansion ratio"), .group = N_("Ratios"),
    .dimension = HL_DIMENSION_RATIO, .flags = HL_QUANTITY_RESULT,
    NO_DEFAULT, RANGE (1.3, 300.0), LIMITS (0.0, 1e5), .yield_rank = 22,
    .help = N_("Motive over suction pressure.") },
};

const HlKind hl_kind_ejector = {
  .id = "ejector", .letter = "EJ", .name = N_("Ejector"), .shelf_name = N_("ejector"), .shelf_group = N_("Condense"),
  .help = N_("Draws in vapour or steam with motive steam, by given ratios: a vacuum ejector, or one that lifts low pressure steam."),
  .half_width = 3, .half_height = 2,
  .ports = ROWS (ports), .quantities = ROWS (quantities),
};
