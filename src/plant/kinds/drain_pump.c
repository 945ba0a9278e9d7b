/* Drain pump: pumps the drain of a heater forward.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "plant/kinds/pump-rows.h"

PUMP_SUCTION_WORDS

static const HlOptionKind options[] = { PUMP_SUCTION_OPTION };

static const HlPortKind ports[] = { PUMP_PORTS };

static const HlQuantityKind quantities[] = {
  PUMP_DELIVERY (0.72, N_("common practice, no source: between condensate pumps, 0.75, and small feed pumps, 0.70"))
  PUMP_SUCTION (2.5, N_("an example, no source: the maker decides"))
  PUMP_POWER
};

const HlKind hl_kind_drain_pump = {
  .id = "drain_pump", .letter = "DP", .name = N_("Drain pump"), .shelf_name = N_("drain pump"), .shelf_group = N_("Feed"),
  .help = N_("Pumps the drain of a heater into the feed line behind it; driven by a motor unless it sits on a shaft."),
  .shaft = HL_SHAFT_DRIVEN, .half_width = 2, .half_height = 2,
  .ports = ROWS (ports), .options = ROWS (options), .quantities = ROWS (quantities),
};
