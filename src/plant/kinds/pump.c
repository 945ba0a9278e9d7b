/* Pump with motor, or driven by a shaft.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "plant/kinds/pump-rows.h"

PUMP_SUCTION_WORDS

static const HlOptionKind options[] = { PUMP_SUCTION_OPTION };

static const HlPortKind ports[] = { PUMP_PORTS };

static const HlQuantityKind quantities[] = {
  PUMP_DELIVERY (0.75, N_("common practice, no source: condensate pumps 0.75, boiler feed pumps small 0.70, large 0.82"))
  PUMP_SUCTION (3.0, N_("an example, no source: 2-4 m for condensate pumps, more for feed pumps; the maker decides"))
  PUMP_POWER
};

const HlKind hl_kind_pump = {
  .id = "pump", .letter = "P", .name = N_("Pump"), .shelf_name = N_("pump"), .shelf_group = N_("Feed"),
  .help = N_("Raises the pressure of a liquid; driven by a motor unless it sits on a shaft."),
  .shaft = HL_SHAFT_DRIVEN, .half_width = 2, .half_height = 2,
  .ports = ROWS (ports), .options = ROWS (options), .quantities = ROWS (quantities),
};
