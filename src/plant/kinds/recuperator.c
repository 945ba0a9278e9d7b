/* Recuperator: exhaust vapour warms what goes to the heater.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "plant/kinds/exchange.h"

static const HlPortKind ports[] = { SIDE_PORTS };

static const HlQuantityKind quantities[] = {
  PINCH_ROW (8.0, N_("common practice, no source: organic cycles 3-15 K")),
  SIDE_LOSS_ROW ("hot_pressure_loss", N_("Hot side pressure loss"), N_("Pressure lost by the hot side as a part of its inlet pressure."),
                 0.02, N_("a first guess, no source: exhaust vapour has little pressure to lose")),
  SIDE_LOSS_ROW ("cold_pressure_loss", N_("Cold side pressure loss"), N_("Pressure lost by the cold side as a part of its inlet pressure."),
                 0.01, N_("a first guess, no source")),
  EXCHANGE_ROWS,
};

static const HlRating ratings[] = { { .frozen = "UA", .found = "pinch" } };

const HlKind hl_kind_recuperator = {
  .id = "recuperator", .letter = "R", .name = N_("Recuperator"), .shelf_name = N_("recuperator"), .shelf_group = N_("Heat"),
  .help = N_("Warms what goes to the heater with the exhaust vapour of the same cycle."),
  .half_width = 2, .half_height = 2,
  .ports = ROWS (ports), .quantities = ROWS (quantities), .ratings = ROWS (ratings),
};
