/* Pipe with pressure and heat loss.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "plant/kinds/kinds.h"

static const HlPortKind ports[] = {
  { .key = "inlet", .name = N_("inlet"), .direction = HL_PORT_IN, .side = HL_SIDE_LEFT, .x = -2, .y = 0 },
  { .key = "outlet", .name = N_("outlet"), .direction = HL_PORT_OUT, .side = HL_SIDE_RIGHT, .x = 2, .y = 0 },
};

static const HlQuantityKind quantities[] = {
  { .key = "pressure_loss", .sign = "Δp/p", .name = N_("Pressure loss"), .group = N_("Losses"),
    .dimension = HL_DIMENSION_RATIO, .flags = HL_QUANTITY_ASSUMED | HL_QUANTITY_PERCENT,
    DEFAULT (0.025, N_("practitioner's design values, from a secondary text: main steam 2.5 %, hot reheat 2 %, cold reheat 1.5 %; extraction lines 4 %")),
    RANGE (0.0, 0.08), LIMITS_LOSS, .yield_rank = 62,
    .help = N_("Pressure lost along the pipe as a part of the inlet pressure.") },
  { .key = "heat_loss", .sign = "Q", .name = N_("Heat loss"), .group = N_("Losses"),
    .dimension = HL_DIMENSION_POWER, .flags = HL_QUANTITY_ASSUMED,
    DEFAULT (0.0, N_("simplification, no source: a well lagged pipe loses little")),
    RANGE (0.0, 1e6), LIMITS_POWER, .yield_rank = 63,
    .help = N_("Heat that the pipe gives to its surroundings.") },
  { .key = "temperature_drop", .sign = "ΔT", .name = N_("Temperature drop"), .group = N_("Losses"),
    .dimension = HL_DIMENSION_TEMPERATURE_DIFFERENCE, .flags = HL_QUANTITY_RESULT, NO_DEFAULT, NO_RANGE, LIMITS (-1000.0, 1000.0),
    .help = N_("Inlet temperature minus outlet temperature.") },
};

const HlKind hl_kind_pipe = {
  .id = "pipe", .letter = "L", .name = N_("Pipe"), .shelf_name = N_("pipe"), .shelf_group = N_("Lines"),
  .help = N_("A line whose pressure and heat loss count."),
  .half_width = 2, .half_height = 1,
  .ports = ROWS (ports), .quantities = ROWS (quantities),
};
