/* Evaporator: a medium takes up heat and leaves as vapour, superheated by a few kelvin.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "plant/kinds/exchange.h"

enum { SOURCE_STREAM, SOURCE_NONE };
static const char *const source_words[] = { "stream", "none", NULL };
static const char *const source_names[] = { N_("a stream"), N_("not drawn"), NULL };

#define WITH_SOURCE .when_option = "source", .when_choice = SOURCE_STREAM

static const HlOptionKind options[] = {
  { .key = "source", .name = N_("Heat comes from"), .least = 0, .most = 1, .usual = SOURCE_STREAM, .choices = source_words, .choice_names = source_names },
  COUNTS_OPTION (HL_COUNTS_INPUT),
};

static const HlPortKind ports[] = {
  { .key = "hot_inlet", .name = N_("heat source inlet"), .direction = HL_PORT_IN, .side = HL_SIDE_UP, .x = 0, .y = -2, WITH_SOURCE },
  { .key = "hot_outlet", .name = N_("heat source outlet"), .direction = HL_PORT_OUT, .side = HL_SIDE_DOWN, .x = 0, .y = 2, WITH_SOURCE },
  { .key = "cold_inlet", .name = N_("liquid inlet"), .direction = HL_PORT_IN, .side = HL_SIDE_RIGHT, .x = 2, .y = 0, .side_circuit = 1 },
  { .key = "cold_outlet", .name = N_("vapour outlet"), .direction = HL_PORT_OUT, .side = HL_SIDE_LEFT, .x = -2, .y = 0, .side_circuit = 1 },
};

static const HlQuantityKind quantities[] = {
  { .key = "superheat", .sign = "ΔT", .name = N_("Superheat"), .group = N_("Evaporation"),
    .dimension = HL_DIMENSION_TEMPERATURE_DIFFERENCE, .flags = HL_QUANTITY_ASSUMED | HL_QUANTITY_USUAL,
    DEFAULT (5.0, N_("common practice, no source: 3-10 K keep drops out of a compressor; 2-5 K ahead of an organic turbine")),
    RANGE (0.0, 20.0), LIMITS_DIFFERENCE, .yield_rank = 40,
    .help = N_("Temperature of the vapour that leaves above its saturation temperature; 0 where it leaves saturated or wet.") },
  { .key = "evaporation_T", .sign = "T", .name = N_("Evaporation temperature"), .group = N_("Evaporation"),
    .dimension = HL_DIMENSION_TEMPERATURE, .flags = HL_QUANTITY_RESULT, NO_DEFAULT, NO_RANGE, LIMITS_TEMPERATURE, .yield_rank = 14,
    .help = N_("Saturation temperature at the pressure of the vapour that leaves.") },
  PINCH_ROW_WHEN (5.0, N_("common practice, no source: evaporators of heat pumps 3-8 K, of organic cycles 3-15 K"), WITH_SOURCE),
  SIDE_LOSS_ROW_WHEN ("hot_pressure_loss", N_("Source side pressure loss"), N_("Pressure lost by the heat source as a part of its inlet pressure."),
                      0.0, N_("simplification, no source: no pressure is lost"), WITH_SOURCE),
  SIDE_LOSS_ROW ("cold_pressure_loss", N_("Pressure loss"), N_("Pressure lost by the medium that boils as a part of its inlet pressure."),
                 0.0, N_("simplification, no source: no pressure is lost")),
  EXCHANGE_ROWS_WHEN (WITH_SOURCE),
  HEAT_ROW (N_("Heat that the medium takes up.")),
};

static const HlRating ratings[] = { { .frozen = "UA", .found = "pinch" } };

const HlKind hl_kind_evaporator = {
  .id = "evaporator", .letter = "EV", .name = N_("Evaporator"), .shelf_name = N_("evaporator"), .shelf_group = N_("Heat"),
  .help = N_("Boils a medium with the heat of a source, as in a heat pump or an organic cycle; below the critical pressure only."),
  .half_width = 2, .half_height = 2,
  .ports = ROWS (ports), .options = ROWS (options), .quantities = ROWS (quantities), .ratings = ROWS (ratings),
};
