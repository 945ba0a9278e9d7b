/* Splitter: one line becomes two or three of the same state.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "plant/kinds/kinds.h"

static const HlOptionKind options[] = {
  { .key = "outlets", .name = N_("Outlets"), .least = 2, .most = 3, .usual = 2 },
};

static const HlPortPlace outlet_places[] = { { 1, 0, HL_SIDE_RIGHT }, { 0, 1, HL_SIDE_DOWN }, { 0, -1, HL_SIDE_UP } };

static const HlPortKind ports[] = {
  { .key = "inlet", .name = N_("inlet"), .direction = HL_PORT_IN, .side = HL_SIDE_LEFT, .x = -1, .y = 0 },
  { .key = "outlet#", .name = N_("outlet"), .direction = HL_PORT_OUT, .side = HL_SIDE_RIGHT, .x = 1, .y = 0,
    .repeat = "outlets", .places = outlet_places },
};

static const HlQuantityKind quantities[] = {
  { .key = "fraction#", .sign = "m/m", .name = N_("Fraction of flow"), .group = N_("Flow"),
    .dimension = HL_DIMENSION_RATIO, .flags = HL_QUANTITY_RESULT, NO_DEFAULT, NO_RANGE, LIMITS_FRACTION, .yield_rank = 20,
    .help = N_("Flow at this outlet over flow at the inlet."), .repeat = "outlets" },
};

const HlKind hl_kind_splitter = {
  .id = "splitter", .letter = "X", .name = N_("Splitter"), .shelf_name = N_("splitter"), .shelf_group = N_("Lines"),
  .help = N_("Divides a stream; all branches have its state."),
  .half_width = 1, .half_height = 1,
  .ports = ROWS (ports), .options = ROWS (options), .quantities = ROWS (quantities),
};
