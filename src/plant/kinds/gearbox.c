/* Gearbox on a shaft.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "plant/kinds/kinds.h"

static const HlQuantityKind quantities[] = {
  { .key = "efficiency", .sign = "η", .name = N_("Gearbox efficiency"), .group = N_("Power"),
    .dimension = HL_DIMENSION_RATIO, .flags = HL_QUANTITY_ASSUMED,
    DEFAULT (0.98, N_("common practice, no source")), RANGE (0.97, 0.99), LIMITS_EFFICIENCY, .yield_rank = 81,
    .help = N_("Power that goes on over power that comes in.") },
  { .key = "input_power", .sign = "P", .name = N_("Power in"), .group = N_("Power"),
    .dimension = HL_DIMENSION_POWER, .flags = HL_QUANTITY_RESULT,
    NO_DEFAULT, NO_RANGE, LIMITS (-1e12, 1e12),
    .help = N_("Power that comes to it along the shaft; less than nothing where it runs back.") },
  { .key = "output_power", .sign = "P", .name = N_("Power out"), .group = N_("Power"),
    .dimension = HL_DIMENSION_POWER, .flags = HL_QUANTITY_RESULT,
    NO_DEFAULT, NO_RANGE, LIMITS (-1e12, 1e12),
    .help = N_("Power that goes on along the shaft.") },
  { .key = "loss", .sign = "P", .name = N_("Gearbox loss"), .group = N_("Power"),
    .dimension = HL_DIMENSION_POWER, .flags = HL_QUANTITY_RESULT,
    NO_DEFAULT, NO_RANGE, LIMITS_POWER,
    .help = N_("Power that becomes heat in the oil.") },
};

const HlKind hl_kind_gearbox = {
  .id = "gearbox", .letter = "GB", .name = N_("Gearbox"), .shelf_name = N_("gearbox"), .shelf_group = N_("Expand"),
  .help = N_("Joins two parts of a shaft and loses a part of the power that passes from one to the other."),
  .shaft = HL_SHAFT_LOSS, .half_width = 2, .half_height = 2,
  .quantities = ROWS (quantities),
};
