/* Motor on a shaft.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "plant/kinds/kinds.h"

static const HlQuantityKind quantities[] = {
  { .key = "efficiency", .sign = "η_m", .name = N_("Motor efficiency"), .group = N_("Power"),
    .dimension = HL_DIMENSION_RATIO, .flags = HL_QUANTITY_ASSUMED,
    DEFAULT (0.95, N_("common practice, no source; motor classes: IEC 60034-30-1")), RANGE (0.85, 0.97), LIMITS_EFFICIENCY, .yield_rank = 82,
    .help = N_("Shaft power over electrical power.") },
  { .key = "power", .sign = "P", .name = N_("Shaft power"), .group = N_("Power"),
    .dimension = HL_DIMENSION_POWER, .flags = HL_QUANTITY_RESULT,
    NO_DEFAULT, NO_RANGE, LIMITS_POWER,
    .help = N_("Power that the motor gives to its shaft.") },
  { .key = "motor_power", .sign = "P_el", .name = N_("Motor power"), .group = N_("Power"),
    .dimension = HL_DIMENSION_POWER, .flags = HL_QUANTITY_RESULT,
    NO_DEFAULT, NO_RANGE, LIMITS_POWER,
    .help = N_("Electrical power of the motor.") },
};

const HlKind hl_kind_motor = {
  .id = "motor", .letter = "EM", .name = N_("Motor"), .shelf_name = N_("motor"), .shelf_group = N_("Feed"),
  .help = N_("Drives the machines of its shaft with what turbines do not give."),
  .shaft = HL_SHAFT_DRIVES, .half_width = 2, .half_height = 2,
  .quantities = ROWS (quantities),
};
