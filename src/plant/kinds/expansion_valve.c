/* Expansion valve of a heat pump or refrigerating machine.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "plant/kinds/kinds.h"

static const HlPortKind ports[] = {
  { .key = "inlet", .name = N_("liquid inlet"), .direction = HL_PORT_IN, .side = HL_SIDE_LEFT, .x = -2, .y = 0 },
  { .key = "outlet", .name = N_("outlet"), .direction = HL_PORT_OUT, .side = HL_SIDE_RIGHT, .x = 2, .y = 0 },
};

static const HlQuantityKind quantities[] = {
  { .key = "outlet.p", .sign = "p", .name = N_("Outlet pressure"), .group = N_("Throttling"),
    .dimension = HL_DIMENSION_PRESSURE, .flags = HL_QUANTITY_USUAL, NO_DEFAULT, RANGE (0.05e5, 100e5), LIMITS_PRESSURE, .yield_rank = 20,
    .help = N_("Pressure behind the valve; mostly the evaporator decides it.") },
  { .key = "pressure_drop", .sign = "Δp", .name = N_("Pressure drop"), .group = N_("Throttling"),
    .dimension = HL_DIMENSION_PRESSURE_DIFFERENCE, .flags = HL_QUANTITY_RESULT, NO_DEFAULT, NO_RANGE, LIMITS (-1e9, 1e9), .yield_rank = 21,
    .help = N_("Inlet pressure minus outlet pressure.") },
  { .key = "flash_fraction", .sign = "x", .name = N_("Flash vapour"), .group = N_("Throttling"),
    .dimension = HL_DIMENSION_RATIO, .flags = HL_QUANTITY_RESULT | HL_QUANTITY_PERCENT, NO_DEFAULT, RANGE (0.0, 0.5), LIMITS_FRACTION, .yield_rank = 22,
    .help = N_("Vapour mass fraction behind the valve: what no longer boils in the evaporator; 0 where all stays liquid.") },
};

const HlKind hl_kind_expansion_valve = {
  .id = "expansion_valve", .letter = "XV", .name = N_("Expansion valve"), .shelf_name = N_("expansion valve"), .shelf_group = N_("Expand"),
  .help = N_("Lets liquid down from the condenser to the evaporator at constant enthalpy."),
  .half_width = 2, .half_height = 1,
  .ports = ROWS (ports), .quantities = ROWS (quantities),
};
