/* Superheater and reheater: heat steam by flue gas.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "plant/kinds/bank.h"

static const HlPortKind ports[] = { GAS_PORTS, COIL_PORTS };

#define STEAM_BANK_ROWS(loss, source) \
  HOT_END_ROW (30.0, COMMON_PRACTICE, 20.0, 400.0), OUTLET_T_ROW (N_("Steam outlet temperature")), GAS_OUTLET_ROW, COLD_END_ROW, LEAST_ROW, \
  COLD_LOSS_ROW (loss, source), GAS_LOSS_ROWS (0.003, DRAUGHT), BANK_RESULT_ROWS

static const HlQuantityKind superheater_quantities[] = {
  STEAM_BANK_ROWS (0.05, N_("common practice, no source: drum to stop valve 8 %, the superheater the larger part")),
};
static const HlQuantityKind reheater_quantities[] = {
  STEAM_BANK_ROWS (0.05, N_("common practice, no source: reheater with both pipes 9 %, the reheater half of it")),
};

const HlKind hl_kind_superheater = {
  .id = "superheater", .letter = "SH", .name = N_("Superheater"), .shelf_name = N_("superheater"), .shelf_group = N_("Gas path"),
  .help = N_("Superheats steam by flue gas, to a given difference below the gas that comes in."),
  .half_width = 2, .half_height = 2,
  .ports = ROWS (ports), .quantities = ROWS (superheater_quantities),
};

const HlKind hl_kind_reheater = {
  .id = "reheater", .letter = "RH", .name = N_("Reheater"), .shelf_name = N_("reheater"), .shelf_group = N_("Gas path"),
  .help = N_("Heats steam that comes back from a turbine by flue gas."),
  .half_width = 2, .half_height = 2,
  .ports = ROWS (ports), .quantities = ROWS (reheater_quantities),
};
