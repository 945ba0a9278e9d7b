/* Flash vessel: parts vapour and liquid.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "plant/kinds/kinds.h"

static const HlPortKind ports[] = {
  { .key = "inlet", .name = N_("inlet"), .direction = HL_PORT_IN, .side = HL_SIDE_LEFT, .x = -2, .y = 0 },
  { .key = "steam", .name = N_("vapour outlet"), .direction = HL_PORT_OUT, .side = HL_SIDE_UP, .x = 0, .y = -3 },
  { .key = "drain", .name = N_("liquid outlet"), .direction = HL_PORT_OUT, .side = HL_SIDE_DOWN, .x = 0, .y = 3 },
};

static const HlQuantityKind quantities[] = {
  { .key = "steam.p", .sign = "p", .name = N_("Vessel pressure"), .group = N_("Vessel"),
    .dimension = HL_DIMENSION_PRESSURE, .flags = HL_QUANTITY_USUAL,
    NO_DEFAULT, RANGE (0.2e5, 60e5), LIMITS_PRESSURE, .yield_rank = 20,
    .help = N_("Pressure of the vessel and of both outlets; what the vapour flows into mostly decides it.") },
  { .key = "flash_fraction", .sign = "m/m", .name = N_("Flash steam"), .group = N_("Result"),
    .dimension = HL_DIMENSION_RATIO, .flags = HL_QUANTITY_RESULT | HL_QUANTITY_PERCENT,
    NO_DEFAULT, NO_RANGE, LIMITS_FRACTION,
    .help = N_("Vapour over all that flows in.") },
  ELEVATION
};

const HlKind hl_kind_flash_vessel = {
  .id = "flash_vessel", .letter = "FV", .name = N_("Flash vessel"), .shelf_name = N_("flash vessel"), .shelf_group = N_("Feed"),
  .help = N_("Throttles what flows in to its own pressure and parts it into saturated vapour and liquid."),
  .half_width = 2, .half_height = 3,
  .ports = ROWS (ports), .quantities = ROWS (quantities),
};
