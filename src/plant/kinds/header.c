/* Header: a main that several lines feed and several are fed from.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "plant/kinds/kinds.h"

static const HlOptionKind options[] = {
  { .key = "inlets", .name = N_("Inlets"), .least = 1, .most = 4, .usual = 2 },
  { .key = "outlets", .name = N_("Outlets"), .least = 1, .most = 6, .usual = 2 },
};

static const HlPortPlace inlet_places[] = { { -3, -1, HL_SIDE_UP }, { 3, -1, HL_SIDE_UP }, { 0, -1, HL_SIDE_UP }, { -6, 0, HL_SIDE_LEFT } };
static const HlPortPlace outlet_places[] = {
  { -3, 1, HL_SIDE_DOWN }, { 3, 1, HL_SIDE_DOWN }, { 0, 1, HL_SIDE_DOWN }, { 6, 0, HL_SIDE_RIGHT }, { -5, 1, HL_SIDE_DOWN }, { 5, 1, HL_SIDE_DOWN },
};

static const HlPortKind ports[] = {
  { .key = "inlet#", .name = N_("inlet"), .direction = HL_PORT_IN, .side = HL_SIDE_UP, .x = -3, .y = -1, .repeat = "inlets", .places = inlet_places },
  { .key = "outlet#", .name = N_("outlet"), .direction = HL_PORT_OUT, .side = HL_SIDE_DOWN, .x = -3, .y = 1, .repeat = "outlets", .places = outlet_places },
};

static const HlQuantityKind quantities[] = {
  { .key = "pressure", .sign = "p", .name = N_("Header pressure"), .group = N_("Header"),
    .dimension = HL_DIMENSION_PRESSURE, .flags = HL_QUANTITY_USUAL,
    NO_DEFAULT, RANGE (1e5, 300e5), LIMITS_PRESSURE, .yield_rank = 20,
    .help = N_("The one pressure of the header and of all its ports.") },
};

const HlKind hl_kind_header = {
  .id = "header", .letter = "HD", .name = N_("Header"), .shelf_name = N_("header"), .shelf_group = N_("Lines"),
  .help = N_("Joins several streams at one pressure and divides them again; all outlets have the mixed state."),
  .half_width = 6, .half_height = 1,
  .ports = ROWS (ports), .options = ROWS (options), .quantities = ROWS (quantities),
};
