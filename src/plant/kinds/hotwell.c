/* Hotwell: collects condensate, drains and make-up.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "plant/kinds/kinds.h"

static const HlOptionKind options[] = {
  { .key = "inlets", .name = N_("Inlets"), .least = 1, .most = 4, .usual = 1 },
};

static const HlPortPlace inlet_places[] = { { 0, -1, HL_SIDE_UP }, { -3, 0, HL_SIDE_LEFT }, { 3, 0, HL_SIDE_RIGHT }, { -2, -1, HL_SIDE_UP } };

static const HlPortKind ports[] = {
  { .key = "inlet#", .name = N_("condensate inlet"), .direction = HL_PORT_IN, .side = HL_SIDE_UP, .x = 0, .y = -1,
    .repeat = "inlets", .places = inlet_places },
  { .key = "outlet", .name = N_("outlet"), .direction = HL_PORT_OUT, .side = HL_SIDE_DOWN, .x = 0, .y = 1 },
};

static const HlQuantityKind quantities[] = {
  { .key = "outlet.p", .sign = "p", .name = N_("Vessel pressure"), .group = N_("Vessel"),
    .dimension = HL_DIMENSION_PRESSURE, .flags = HL_QUANTITY_USUAL,
    NO_DEFAULT, RANGE (2500.0, 5e5), LIMITS_PRESSURE, .yield_rank = 20,
    .help = N_("The one pressure of the vessel and of all its ports; mostly the condenser above it decides it.") },
  ELEVATION
};

const HlKind hl_kind_hotwell = {
  .id = "hotwell", .letter = "HW", .name = N_("Hotwell"), .shelf_name = N_("hotwell"), .shelf_group = N_("Condense"),
  .help = N_("Collects condensate, drains and make-up at one pressure; the condensate pump draws from it."),
  .half_width = 3, .half_height = 1,
  .ports = ROWS (ports), .options = ROWS (options), .quantities = ROWS (quantities),
};
