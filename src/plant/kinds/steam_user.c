/* Process steam user that returns part of its condensate.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "plant/kinds/kinds.h"

static const HlPortKind ports[] = {
  { .key = "steam", .name = N_("steam inlet"), .direction = HL_PORT_IN, .side = HL_SIDE_UP, .x = 0, .y = -2 },
  { .key = "condensate", .name = N_("condensate outlet"), .direction = HL_PORT_OUT, .side = HL_SIDE_DOWN, .x = 0, .y = 2 },
};

static const HlQuantityKind quantities[] = {
  { .key = "heat", .sign = "Q", .name = N_("Heat used"), .group = N_("Duty"),
    .dimension = HL_DIMENSION_POWER, .flags = HL_QUANTITY_USUAL | HL_QUANTITY_RESULT,
    DEFAULT (5e6, N_("an example size, no source")), NO_RANGE, LIMITS_POWER, .yield_rank = 20,
    .help = N_("Steam flow times the fall of its enthalpy down to that of the condensate; lost water counts at the condensate's state.") },
  { .key = "return_fraction", .sign = "m/m", .name = N_("Condensate returned"), .group = N_("Condensate"),
    .dimension = HL_DIMENSION_RATIO, .flags = HL_QUANTITY_ASSUMED | HL_QUANTITY_PERCENT,
    DEFAULT (1.0, N_("simplification, no source: all condensate comes back; ask the process")),
    RANGE (0.0, 1.0), LIMITS_FRACTION, .yield_rank = 60,
    .help = N_("Condensate flow over steam flow.") },
  { .key = "condensate.T", .sign = "T", .name = N_("Condensate temperature"), .group = N_("Condensate"),
    .dimension = HL_DIMENSION_TEMPERATURE, .flags = HL_QUANTITY_ASSUMED,
    DEFAULT (358.15, N_("common practice, no source: 85 °C")), RANGE (303.15, 453.15), LIMITS_TEMPERATURE, .yield_rank = 40,
    .help = N_("Temperature of the condensate that comes back.") },
  { .key = "condensate.p", .sign = "p", .name = N_("Condensate pressure"), .group = N_("Condensate"),
    .dimension = HL_DIMENSION_PRESSURE, .flags = HL_QUANTITY_USUAL | HL_QUANTITY_ASSUMED,
    DEFAULT (3e5, N_("common practice, no source: enough to reach the feed tank")), RANGE (1e5, 20e5), LIMITS_PRESSURE, .yield_rank = 15,
    .help = N_("Pressure of the condensate that comes back.") },
  { .key = "lost_flow", .sign = "m", .name = N_("Water lost"), .group = N_("Condensate"),
    .dimension = HL_DIMENSION_MASS_FLOW, .flags = HL_QUANTITY_RESULT, NO_DEFAULT, NO_RANGE, LIMITS_FLOW,
    .help = N_("Steam flow that does not come back as condensate; make-up replaces it.") },
};

const HlKind hl_kind_steam_user = {
  .id = "steam_user", .letter = "U", .name = N_("Process steam user"), .shelf_name = N_("steam user"), .shelf_group = N_("Duty"),
  .help = N_("Takes steam for a process and returns all or part of it as condensate."),
  .half_width = 2, .half_height = 2,
  .ports = ROWS (ports), .quantities = ROWS (quantities),
};
