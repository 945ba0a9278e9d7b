/* Air preheater: flue gas heats combustion air.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "plant/kinds/bank.h"

static const HlPortKind ports[] = { GAS_PORTS, AIR_PORTS };

static const HlQuantityKind quantities[] = {
  HOT_END_ROW (60.0, N_("common practice, no source: 30-150 K"), 25.0, 400.0),
  { .key = "air_outlet.T", .sign = "T", .name = N_("Air outlet temperature"), .group = N_("Heat transfer"),
    .dimension = HL_DIMENSION_TEMPERATURE, .flags = HL_QUANTITY_RESULT | HL_QUANTITY_USUAL, NO_DEFAULT, NO_RANGE, LIMITS_TEMPERATURE, .yield_rank = 12,
    .help = N_("Temperature of the air as it leaves; another way to say the difference.") },
  GAS_OUTLET_ROW, COLD_END_ROW, LEAST_ROW,
  { .key = "effectiveness", .sign = "ε", .name = N_("Effectiveness"), .group = N_("Heat transfer"),
    .dimension = HL_DIMENSION_RATIO, .flags = HL_QUANTITY_RESULT, NO_DEFAULT, RANGE (0.3, 0.97), LIMITS_FRACTION, .yield_rank = 17,
    .help = N_("Heat that reaches the air over what would pass if the stream that can take less left at the other's inlet temperature.") },
  { .key = "pressure_loss", .sign = "Δp/p", .name = N_("Air pressure loss"), .group = N_("Losses"),
    .dimension = HL_DIMENSION_RATIO, .flags = HL_QUANTITY_ASSUMED | HL_QUANTITY_PERCENT,
    DEFAULT (0.008, N_("common practice, no source: 5-15 mbar")), RANGE (0.0, 0.03), LIMITS_LOSS, .yield_rank = 62,
    .help = N_("Pressure lost by the air as a part of its inlet pressure.") },
  GAS_LOSS_ROWS (0.008, N_("common practice, no source: 5-15 mbar")),
  BANK_RESULT_ROWS,
};

const HlKind hl_kind_air_preheater = {
  .id = "air_preheater", .letter = "AH", .name = N_("Air preheater"), .shelf_name = N_("air preheater"), .shelf_group = N_("Gas path"),
  .help = N_("Heats combustion air by flue gas; air that leaks into the gas is not counted."),
  .half_width = 2, .half_height = 2,
  .ports = ROWS (ports), .quantities = ROWS (quantities),
};
