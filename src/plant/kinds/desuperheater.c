/* Desuperheater: spray into steam.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "plant/kinds/kinds.h"

static const HlPortKind ports[] = {
  { .key = "steam", .name = N_("steam inlet"), .direction = HL_PORT_IN, .side = HL_SIDE_LEFT, .x = -2, .y = 0 },
  { .key = "outlet", .name = N_("outlet"), .direction = HL_PORT_OUT, .side = HL_SIDE_RIGHT, .x = 2, .y = 0 },
  { .key = "spray", .name = N_("spray water inlet"), .direction = HL_PORT_IN, .side = HL_SIDE_DOWN, .x = 0, .y = 1 },
};

static const HlQuantityKind quantities[] = {
  { .key = "outlet.T", .sign = "T", .name = N_("Outlet temperature"), .group = N_("Steam"),
    .dimension = HL_DIMENSION_TEMPERATURE, .flags = HL_QUANTITY_ASSUMED | HL_QUANTITY_USUAL,
    DEFAULT (473.15, N_("an example, no source: 200 °C")), RANGE (373.15, 853.15), LIMITS_TEMPERATURE, .yield_rank = 20,
    .help = N_("Temperature of the steam behind the spray.") },
  { .key = "outlet_superheat", .sign = "ΔT", .name = N_("Superheat"), .group = N_("Steam"),
    .dimension = HL_DIMENSION_TEMPERATURE_DIFFERENCE, .flags = HL_QUANTITY_RESULT,
    NO_DEFAULT, RANGE (5.0, 300.0), LIMITS (-1000.0, 1000.0), .yield_rank = 21,
    .help = N_("Outlet temperature above saturation; another way to say the outlet temperature.") },
  { .key = "pressure_loss", .sign = "Δp/p", .name = N_("Pressure loss"), .group = N_("Losses"),
    .dimension = HL_DIMENSION_RATIO, .flags = HL_QUANTITY_ASSUMED | HL_QUANTITY_PERCENT,
    DEFAULT (0.02, N_("a first guess, no source")), RANGE (0.0, 0.1), LIMITS_LOSS, .yield_rank = 60,
    .help = N_("Pressure lost as a part of the inlet pressure.") },
  { .key = "spray_fraction", .sign = "m/m", .name = N_("Spray of outlet flow"), .group = N_("Result"),
    .dimension = HL_DIMENSION_RATIO, .flags = HL_QUANTITY_RESULT | HL_QUANTITY_PERCENT,
    NO_DEFAULT, NO_RANGE, LIMITS_FRACTION,
    .help = N_("Spray water over the steam that leaves.") },
};

const HlKind hl_kind_desuperheater = {
  .id = "desuperheater", .letter = "DS", .name = N_("Desuperheater"), .shelf_name = N_("desuperheater"), .shelf_group = N_("Lines"),
  .help = N_("Sprays water into steam to bring it to a temperature."),
  .half_width = 2, .half_height = 1,
  .ports = ROWS (ports), .quantities = ROWS (quantities),
};
