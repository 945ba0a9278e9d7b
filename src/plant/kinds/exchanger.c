/* General exchanger: heat from a hot to a cold stream in counterflow.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "plant/kinds/exchange.h"

static const HlOptionKind options[] = { COUNTS_OPTION (HL_COUNTS_INSIDE) };

static const HlPortKind ports[] = { SIDE_PORTS };

static const HlQuantityKind quantities[] = {
  PINCH_ROW (8.0, N_("common practice, no source: 3-15 K; bare boiler tubes up to 80 K")),
  SIDE_LOSS_ROW ("hot_pressure_loss", N_("Hot side pressure loss"), N_("Pressure lost by the hot side as a part of its inlet pressure."),
                 0.0, N_("simplification, no source: no pressure is lost")),
  SIDE_LOSS_ROW ("cold_pressure_loss", N_("Cold side pressure loss"), N_("Pressure lost by the cold side as a part of its inlet pressure."),
                 0.0, N_("simplification, no source: no pressure is lost")),
  EXCHANGE_ROWS,
};

static const HlRating ratings[] = { { .frozen = "UA", .found = "pinch" } };

const HlKind hl_kind_exchanger = {
  .id = "exchanger", .letter = "E", .name = N_("Heat exchanger"), .shelf_name = N_("exchanger"), .shelf_group = N_("Heat"),
  .help = N_("Passes heat from a hot to a cold stream in counterflow; either may boil or condense on the way."),
  .half_width = 2, .half_height = 2,
  .ports = ROWS (ports), .options = ROWS (options), .quantities = ROWS (quantities), .ratings = ROWS (ratings),
};
