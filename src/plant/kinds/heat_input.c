/* Heat input: brings the working fluid to a state, whatever the heat comes from.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "plant/kinds/heat-source.h"

static const HlPortKind ports[] = { HEAT_SOURCE_PORTS };

static const HlOptionKind options[] = { REHEAT_OPTION };

static const HlQuantityKind quantities[] = {
  STEAM_ROWS,
  { .key = "pressure_loss", .sign = "Δp/p", .name = N_("Pressure loss"), .group = N_("Losses"),
    .dimension = HL_DIMENSION_RATIO, .flags = HL_QUANTITY_ASSUMED | HL_QUANTITY_PERCENT,
    DEFAULT (0.0, N_("simplification, no source: an ideal heat input loses no pressure")),
    RANGE (0.0, 0.15), LIMITS_LOSS, .yield_rank = 60,
    .help = N_("Pressure lost from feed inlet to steam outlet as a part of the feed pressure.") },
  REHEAT_LOSS_ROW,
  HEAT_ROWS,
  { .key = "source_T", .sign = "T", .name = N_("Temperature of the source"), .group = N_("Heat"),
    .dimension = HL_DIMENSION_TEMPERATURE, .flags = 0, NO_DEFAULT, NO_RANGE, LIMITS_TEMPERATURE, .yield_rank = 97,
    .help = N_("Mean temperature at which the heat is offered; only results of the second law need it. Without it the heat counts at the temperature of the fluid.") },
};

const HlKind hl_kind_heat_input = {
  .id = "heat_input", .letter = "Q", .name = N_("Heat input"), .shelf_name = N_("heat input"), .shelf_group = N_("Heat"),
  .help = N_("Heats the working fluid to a given outlet temperature, or by a given amount of heat, without saying what the heat comes from."),
  .half_width = 3, .half_height = 3,
  .ports = ROWS (ports), .options = ROWS (options), .quantities = ROWS (quantities),
};
