/* Moisture separator: takes water out of wet steam.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "plant/kinds/kinds.h"

static const HlPortKind ports[] = {
  { .key = "inlet", .name = N_("wet steam inlet"), .direction = HL_PORT_IN, .side = HL_SIDE_LEFT, .x = -2, .y = 0 },
  { .key = "steam", .name = N_("steam outlet"), .direction = HL_PORT_OUT, .side = HL_SIDE_RIGHT, .x = 2, .y = 0 },
  { .key = "drain", .name = N_("drain outlet"), .direction = HL_PORT_OUT, .side = HL_SIDE_DOWN, .x = 0, .y = 2 },
};

static const HlQuantityKind quantities[] = {
  { .key = "separation", .sign = "η", .name = N_("Separation efficiency"), .group = N_("Separation"),
    .dimension = HL_DIMENSION_RATIO, .flags = HL_QUANTITY_ASSUMED,
    DEFAULT (0.95, N_("a first guess, no source")), RANGE (0.5, 1.0), LIMITS_FRACTION, .yield_rank = 50,
    .help = N_("Water taken out over water that the steam holds at the pressure of the separator.") },
  { .key = "pressure_loss", .sign = "Δp/p", .name = N_("Pressure loss"), .group = N_("Losses"),
    .dimension = HL_DIMENSION_RATIO, .flags = HL_QUANTITY_ASSUMED | HL_QUANTITY_PERCENT,
    DEFAULT (0.02, N_("a first guess, no source")), RANGE (0.0, 0.1), LIMITS_LOSS, .yield_rank = 60,
    .help = N_("Pressure lost as a part of the inlet pressure.") },
  { .key = "inlet_moisture", .sign = "y", .name = N_("Inlet moisture"), .group = N_("Result"),
    .dimension = HL_DIMENSION_RATIO, .flags = HL_QUANTITY_RESULT | HL_QUANTITY_PERCENT,
    NO_DEFAULT, NO_RANGE, LIMITS_FRACTION,
    .help = N_("Liquid mass fraction of what flows in, at the pressure of the separator.") },
  { .key = "outlet_moisture", .sign = "y", .name = N_("Outlet moisture"), .group = N_("Result"),
    .dimension = HL_DIMENSION_RATIO, .flags = HL_QUANTITY_RESULT | HL_QUANTITY_PERCENT,
    NO_DEFAULT, NO_RANGE, LIMITS_FRACTION,
    .help = N_("Liquid mass fraction of the steam that leaves.") },
};

const HlKind hl_kind_moisture_separator = {
  .id = "moisture_separator", .letter = "MS", .name = N_("Moisture separator"), .shelf_name = N_("moisture separator"), .shelf_group = N_("Expand"),
  .help = N_("Takes a part of the water out of wet steam, between two turbine sections for instance."),
  .half_width = 2, .half_height = 2,
  .ports = ROWS (ports), .quantities = ROWS (quantities),
};
