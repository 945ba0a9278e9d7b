/* Flue-gas condenser: cools flue gas below its dew point.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "plant/kinds/bank.h"

enum { SERVES_CYCLE, SERVES_HEAT };
static const char *const serves_words[] = { "cycle", "heat", NULL };
static const char *const serves_names[] = { N_("water of the cycle"), N_("heat that is delivered"), NULL };

static const HlOptionKind options[] = {
  { .key = "serves", .name = N_("Heats"), .least = 0, .most = 1, .usual = SERVES_CYCLE, .choices = serves_words, .choice_names = serves_names },
};

static const HlPortKind ports[] = { GAS_PORTS, COIL_PORTS };

static const HlQuantityKind quantities[] = {
  { .key = "gas_outlet.T", .sign = "T", .name = N_("Gas outlet temperature"), .group = N_("Heat transfer"),
    .dimension = HL_DIMENSION_TEMPERATURE, .flags = HL_QUANTITY_ASSUMED | HL_QUANTITY_USUAL,
    DEFAULT (323.15, N_("common practice, no source: a few kelvins above the water that comes in, below the dew point of 45-65 °C")),
    RANGE (293.15, 373.15), LIMITS_TEMPERATURE, .yield_rank = 10,
    .help = N_("Temperature of the gas behind this heating surface.") },
  OUTLET_T_ROW (N_("Water outlet temperature")), HOT_END_RESULT_ROW, COLD_END_ROW, LEAST_ROW,
  { .key = "condensate_flow", .sign = "m", .name = N_("Condensate"), .group = N_("Result"),
    .dimension = HL_DIMENSION_MASS_FLOW, .flags = HL_QUANTITY_RESULT, NO_DEFAULT, NO_RANGE, LIMITS_FLOW,
    .help = N_("Water that has condensed from the gas; it stays in the gas stream, which counts it as liquid.") },
  COLD_LOSS_ROW (0.02, COMMON_PRACTICE),
  GAS_LOSS_ROWS (0.005, N_("common practice, no source: 3-10 mbar")),
  BANK_RESULT_ROWS,
};

const HlKind hl_kind_flue_gas_condenser = {
  .id = "flue_gas_condenser", .letter = "FC", .name = N_("Flue-gas condenser"), .shelf_name = N_("flue-gas condenser"), .shelf_group = N_("Gas path"),
  .help = N_("Cools flue gas below the dew point of its water and gives the heat to cool water."),
  .half_width = 2, .half_height = 2,
  .ports = ROWS (ports), .options = ROWS (options), .quantities = ROWS (quantities),
};
