/* Economiser: heats feedwater towards boiling.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "plant/kinds/bank.h"

static const HlPortKind ports[] = { GAS_PORTS, COIL_PORTS };

static const HlQuantityKind quantities[] = {
  { .key = "approach", .sign = "ΔT", .name = N_("Approach"), .group = N_("Heat transfer"),
    .dimension = HL_DIMENSION_TEMPERATURE_DIFFERENCE, .flags = HL_QUANTITY_ASSUMED | HL_QUANTITY_USUAL,
    DEFAULT (8.0, N_("V. Ganapathy: finned surface, gas of 370-650 °C: 6-22 K; gas of 650-980 °C: 22-39 K")), RANGE (5.0, 60.0),
    LIMITS (-1000.0, 1000.0), .yield_rank = 10,
    .help = N_("Saturation temperature at the outlet's pressure minus outlet temperature: what keeps it from steaming.") },
  OUTLET_T_ROW (N_("Water outlet temperature")), GAS_OUTLET_ROW, HOT_END_RESULT_ROW, COLD_END_ROW, LEAST_ROW,
  COLD_LOSS_ROW (0.02, N_("common practice, no source: 1-5 bar")),
  GAS_LOSS_ROWS (0.005, DRAUGHT),
  BANK_RESULT_ROWS,
};

const HlKind hl_kind_economiser = {
  .id = "economiser", .letter = "EC", .name = N_("Economiser"), .shelf_name = N_("economiser"), .shelf_group = N_("Gas path"),
  .help = N_("Heats feedwater by flue gas, to a given approach below boiling."),
  .half_width = 2, .half_height = 2,
  .ports = ROWS (ports), .quantities = ROWS (quantities),
};
