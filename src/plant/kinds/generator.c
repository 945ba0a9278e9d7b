/* Generator at the end of a shaft.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "plant/kinds/kinds.h"

static const HlQuantityKind quantities[] = {
  { .key = "efficiency", .sign = "η_g", .name = N_("Generator efficiency"), .group = N_("Power"),
    .dimension = HL_DIMENSION_RATIO, .flags = HL_QUANTITY_ASSUMED,
    DEFAULT (0.98, N_("common practice, no source: above 10 MW; 0.1-10 MW 0.965; above 250 MW 0.988")),
    RANGE (0.80, 0.99), LIMITS_EFFICIENCY, .yield_rank = 81,
    .help = N_("Electrical power over shaft power.") },
  { .key = "shaft_power", .sign = "P", .name = N_("Shaft power"), .group = N_("Power"),
    .dimension = HL_DIMENSION_POWER, .flags = HL_QUANTITY_RESULT, NO_DEFAULT, NO_RANGE, LIMITS_POWER,
    .help = N_("Power that the shaft leaves for the generator.") },
  { .key = "power", .sign = "P_el", .name = N_("Electrical power"), .group = N_("Power"),
    .dimension = HL_DIMENSION_POWER, .flags = HL_QUANTITY_RESULT, NO_DEFAULT, NO_RANGE, LIMITS_POWER,
    .help = N_("Power at the generator's terminals.") },
};

const HlKind hl_kind_generator = {
  .id = "generator", .letter = "G", .name = N_("Generator"), .shelf_name = N_("generator"), .shelf_group = N_("Expand"),
  .help = N_("Turns the power that its shaft has left into electricity."),
  .shaft = HL_SHAFT_GENERATOR, .half_width = 2, .half_height = 2,
  .quantities = ROWS (quantities),
};
