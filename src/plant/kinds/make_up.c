/* Make-up water: replaces what the cycle loses.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "plant/kinds/kinds.h"

enum { TREATMENT_NONE, TREATMENT_COUNTED };
static const char *const treatment_words[] = { "none", "counted", NULL };
static const char *const treatment_names[] = { N_("not counted"), N_("counted"), NULL };

static const HlOptionKind options[] = {
  { .key = "treatment", .name = N_("Loss of treatment"), .least = 0, .most = 1, .usual = TREATMENT_NONE,
    .choices = treatment_words, .choice_names = treatment_names },
};

#define WITH_TREATMENT .when_option = "treatment", .when_choice = TREATMENT_COUNTED

static const HlPortKind ports[] = {
  { .key = "outlet", .name = N_("outlet"), .direction = HL_PORT_OUT, .side = HL_SIDE_RIGHT, .x = 2, .y = 0 },
};

static const HlQuantityKind quantities[] = {
  { .key = "outlet.T", .sign = "T", .name = N_("Water temperature"), .group = N_("Water"),
    .dimension = HL_DIMENSION_TEMPERATURE, .flags = HL_QUANTITY_ASSUMED | HL_QUANTITY_USUAL,
    DEFAULT (288.15, N_("common practice, no source: 15 °C")), RANGE (273.16, 333.15), LIMITS_TEMPERATURE, .yield_rank = 40,
    .help = N_("Temperature of the make-up water.") },
  { .key = "outlet.p", .sign = "p", .name = N_("Water pressure"), .group = N_("Water"),
    .dimension = HL_DIMENSION_PRESSURE, .flags = HL_QUANTITY_USUAL, NO_DEFAULT, RANGE (1e5, 50e5), LIMITS_PRESSURE, .yield_rank = 15,
    .help = N_("Pressure of the make-up water; mostly the vessel it flows into decides it.") },
  { .key = "outlet.m", .sign = "m", .name = N_("Make-up flow"), .group = N_("Water"),
    .dimension = HL_DIMENSION_MASS_FLOW, .flags = HL_QUANTITY_RESULT, NO_DEFAULT, NO_RANGE, LIMITS_FLOW, .yield_rank = 20,
    .help = N_("Flow that makes up for the water lost.") },
  { .key = "treatment_loss", .sign = "m/m", .name = N_("Loss of raw water"), .group = N_("Treatment"),
    .dimension = HL_DIMENSION_RATIO, .flags = HL_QUANTITY_ASSUMED | HL_QUANTITY_PERCENT,
    DEFAULT (0.10, N_("a first guess, no source: rinsing and rejects; the treatment plant's maker decides")), RANGE (0.02, 0.35), LIMITS_LOSS, .yield_rank = 60,
    .help = N_("Raw water that the treatment rejects over all raw water taken in."), WITH_TREATMENT },
  { .key = "raw_flow", .sign = "m", .name = N_("Raw water"), .group = N_("Treatment"),
    .dimension = HL_DIMENSION_MASS_FLOW, .flags = HL_QUANTITY_RESULT, NO_DEFAULT, NO_RANGE, LIMITS_FLOW,
    .help = N_("Raw water that the treatment takes in."), WITH_TREATMENT },
};

const HlKind hl_kind_make_up = {
  .id = "make_up", .letter = "W", .name = N_("Make-up water"), .shelf_name = N_("make-up"), .shelf_group = N_("Feed"),
  .help = N_("Supplies the water that the cycle loses."),
  .half_width = 2, .half_height = 1,
  .ports = ROWS (ports), .options = ROWS (options), .quantities = ROWS (quantities),
};
