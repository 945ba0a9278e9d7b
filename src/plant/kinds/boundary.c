/* Boundary: where a stream enters or leaves the drawing.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "plant/kinds/kinds.h"

enum { SOURCE, SINK };
static const char *const direction_words[] = { "source", "sink", NULL };
static const char *const direction_names[] = { N_("source"), N_("sink"), NULL };

static const HlOptionKind options[] = {
  { .key = "direction", .name = N_("Direction"), .least = 0, .most = 1, .usual = SOURCE,
    .choices = direction_words, .choice_names = direction_names },
};

#define WHEN_SOURCE .when_option = "direction", .when_choice = SOURCE
#define WHEN_SINK   .when_option = "direction", .when_choice = SINK

static const HlPortKind ports[] = {
  { .key = "outlet", .name = N_("outlet"), .direction = HL_PORT_OUT, .side = HL_SIDE_RIGHT, .x = 2, .y = 0, WHEN_SOURCE },
  { .key = "inlet", .name = N_("inlet"), .direction = HL_PORT_IN, .side = HL_SIDE_LEFT, .x = -2, .y = 0, WHEN_SINK },
};

static const HlQuantityKind quantities[] = {
  { .key = "outlet.p", .sign = "p", .name = N_("Pressure"), .group = N_("Stream"),
    .dimension = HL_DIMENSION_PRESSURE, .flags = HL_QUANTITY_USUAL,
    DEFAULT (3e5, N_("an example, no source")), NO_RANGE, LIMITS_PRESSURE, .yield_rank = 20,
    .help = N_("Pressure of the stream that enters here."), WHEN_SOURCE },
  { .key = "outlet.T", .sign = "T", .name = N_("Temperature"), .group = N_("Stream"),
    .dimension = HL_DIMENSION_TEMPERATURE, .flags = HL_QUANTITY_USUAL,
    DEFAULT (288.15, N_("an example, no source")), NO_RANGE, LIMITS_TEMPERATURE, .yield_rank = 20,
    .help = N_("Temperature of the stream that enters here."), WHEN_SOURCE },
  { .key = "outlet.m", .sign = "m", .name = N_("Flow"), .group = N_("Stream"),
    .dimension = HL_DIMENSION_MASS_FLOW, .flags = HL_QUANTITY_USUAL,
    DEFAULT (10.0, N_("an example, no source")), NO_RANGE, LIMITS_FLOW, .yield_rank = 20,
    .help = N_("Flow that enters here."), WHEN_SOURCE },
  { .key = "inlet.p", .sign = "p", .name = N_("Pressure"), .group = N_("Stream"),
    .dimension = HL_DIMENSION_PRESSURE, .flags = HL_QUANTITY_USUAL,
    DEFAULT (1.01325e5, N_("an example, no source: the standard atmosphere")), NO_RANGE, LIMITS_PRESSURE, .yield_rank = 20,
    .help = N_("Pressure of the stream that leaves here."), WHEN_SINK },
};

const HlKind hl_kind_boundary = {
  .id = "boundary", .letter = "Y", .name = N_("Boundary"), .shelf_name = N_("boundary"), .shelf_group = N_("Lines"),
  .help = N_("A stream enters or leaves the drawing here."),
  .half_width = 2, .half_height = 1,
  .ports = ROWS (ports), .options = ROWS (options), .quantities = ROWS (quantities),
};
