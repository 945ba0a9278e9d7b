/* Mixer: two or three lines become one, at one pressure.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "plant/kinds/kinds.h"

static const HlOptionKind options[] = {
  { .key = "inlets", .name = N_("Inlets"), .least = 2, .most = 3, .usual = 2 },
};

static const HlPortPlace inlet_places[] = { { -1, 0, HL_SIDE_LEFT }, { 0, 1, HL_SIDE_DOWN }, { 0, -1, HL_SIDE_UP } };

static const HlPortKind ports[] = {
  { .key = "inlet#", .name = N_("inlet"), .direction = HL_PORT_IN, .side = HL_SIDE_LEFT, .x = -1, .y = 0,
    .repeat = "inlets", .places = inlet_places },
  { .key = "outlet", .name = N_("outlet"), .direction = HL_PORT_OUT, .side = HL_SIDE_RIGHT, .x = 1, .y = 0 },
};

const HlKind hl_kind_mixer = {
  .id = "mixer", .letter = "M", .name = N_("Mixer"), .shelf_name = N_("mixer"), .shelf_group = N_("Lines"),
  .help = N_("Joins streams of one pressure."),
  .half_width = 1, .half_height = 1,
  .ports = ROWS (ports), .options = ROWS (options),
};
