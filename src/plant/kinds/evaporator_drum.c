/* Evaporator with its drum, on a gas path.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "plant/kinds/bank.h"

enum { BLOWDOWN_NONE, BLOWDOWN_DRUM };
static const char *const blowdown_words[] = { "none", "drum", NULL };
static const char *const blowdown_names[] = { N_("none"), N_("from the drum"), NULL };
enum { TUBES_FINNED, TUBES_BARE };
static const char *const tube_words[] = { "finned", "bare", NULL };
static const char *const tube_names[] = { N_("finned"), N_("bare"), NULL };

static const HlOptionKind options[] = {
  { .key = "tubes", .name = N_("Tubes"), .least = 0, .most = 1, .usual = TUBES_FINNED, .choices = tube_words, .choice_names = tube_names },
  { .key = "blowdown", .name = N_("Blowdown"), .least = 0, .most = 1, .usual = BLOWDOWN_NONE, .choices = blowdown_words, .choice_names = blowdown_names },
};
#define WITH_BLOWDOWN .when_option = "blowdown", .when_choice = BLOWDOWN_DRUM

static const HlPortKind ports[] = {
  { .key = "gas_inlet", .name = N_("gas inlet"), .direction = HL_PORT_IN, .side = HL_SIDE_LEFT, .x = -2, .y = 1, .side_circuit = 1, .medium = FLUE_GAS },
  { .key = "gas_outlet", .name = N_("gas outlet"), .direction = HL_PORT_OUT, .side = HL_SIDE_RIGHT, .x = 2, .y = 1, .side_circuit = 1, .medium = FLUE_GAS },
  { .key = "feed", .name = N_("feed inlet"), .direction = HL_PORT_IN, .side = HL_SIDE_RIGHT, .x = 2, .y = -2 },
  { .key = "steam", .name = N_("saturated steam outlet"), .direction = HL_PORT_OUT, .side = HL_SIDE_UP, .x = 0, .y = -3 },
  { .key = "blowdown", .name = N_("blowdown outlet"), .direction = HL_PORT_OUT, .side = HL_SIDE_LEFT, .x = -2, .y = -2, WITH_BLOWDOWN },
};

static const HlChoiceDefault tube_pinch[] = {
  [TUBES_BARE] = { 55.0, N_("V. Ganapathy: bare tubes, gas of 370-650 °C: 44-72 K; gas of 650-980 °C: 72-83 K") },
};

static const HlQuantityKind quantities[] = {
  { .key = "steam.p", .sign = "p", .name = N_("Drum pressure"), .group = N_("Drum"),
    .dimension = HL_DIMENSION_PRESSURE, .flags = HL_QUANTITY_USUAL,
    DEFAULT (60e5, N_("an example, no source")), RANGE (1.2e5, 200e5), LIMITS_PRESSURE, .yield_rank = 20,
    .help = N_("Pressure of the drum, its feed, its steam and its blowdown; mostly the turbine decides it.") },
  { .key = "blowdown_fraction", .sign = "m/m", .name = N_("Blowdown of feed"), .group = N_("Drum"),
    .dimension = HL_DIMENSION_RATIO, .flags = HL_QUANTITY_ASSUMED | HL_QUANTITY_PERCENT,
    DEFAULT (0.01, N_("common practice, no source: 0.5-3 %, industrial boilers up to 8 %")),
    RANGE (0.005, 0.08), LIMITS_FRACTION, .yield_rank = 75,
    .help = N_("Water let off from the drum, to keep its salts down, over feedwater."), WITH_BLOWDOWN },
  { .key = "pinch", .sign = "ΔT_p", .name = N_("Pinch"), .group = N_("Heat transfer"),
    .dimension = HL_DIMENSION_TEMPERATURE_DIFFERENCE, .flags = HL_QUANTITY_ASSUMED | HL_QUANTITY_USUAL,
    DEFAULT (10.0, N_("V. Ganapathy: finned surface, gas of 370-650 °C: 6-17 K; gas of 650-980 °C: 17-33 K")),
    NO_RANGE, LIMITS (-1000.0, 3000.0), .yield_rank = 10, .default_option = "tubes", .choice_defaults = tube_pinch,
    .help = N_("Temperature of the gas that leaves minus saturation temperature of the drum.") },
  { .key = "approach", .sign = "ΔT_a", .name = N_("Approach of the feed"), .group = N_("Heat transfer"),
    .dimension = HL_DIMENSION_TEMPERATURE_DIFFERENCE, .flags = HL_QUANTITY_RESULT, NO_DEFAULT, NO_RANGE, LIMITS (-1000.0, 1000.0), .yield_rank = 14,
    .help = N_("Saturation temperature of the drum minus temperature of its feed.") },
  GAS_OUTLET_ROW, HOT_END_RESULT_ROW,
  GAS_LOSS_ROWS (0.008, DRAUGHT),
  BANK_RESULT_ROWS,
};

const HlKind hl_kind_evaporator_drum = {
  .id = "evaporator_drum", .letter = "ED", .name = N_("Evaporator with drum"), .shelf_name = N_("evaporator"), .shelf_group = N_("Gas path"),
  .help = N_("Boils the water of its drum by flue gas, to a given pinch; saturated steam leaves."),
  .half_width = 2, .half_height = 3,
  .ports = ROWS (ports), .options = ROWS (options), .quantities = ROWS (quantities),
};
