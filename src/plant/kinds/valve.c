/* Throttle valve: pressure falls at constant enthalpy.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "plant/kinds/kinds.h"

static const HlPortKind ports[] = {
  { .key = "inlet", .name = N_("inlet"), .direction = HL_PORT_IN, .side = HL_SIDE_LEFT, .x = -2, .y = 0 },
  { .key = "outlet", .name = N_("outlet"), .direction = HL_PORT_OUT, .side = HL_SIDE_RIGHT, .x = 2, .y = 0 },
};

static const HlQuantityKind quantities[] = {
  { .key = "outlet.p", .sign = "p", .name = N_("Outlet pressure"), .group = N_("Throttling"),
    .dimension = HL_DIMENSION_PRESSURE, .flags = HL_QUANTITY_USUAL,
    NO_DEFAULT, RANGE (2500.0, 400e5), LIMITS_PRESSURE, .yield_rank = 20,
    .help = N_("Pressure behind the valve.") },
  { .key = "pressure_loss", .sign = "Δp/p", .name = N_("Pressure loss"), .group = N_("Throttling"),
    .dimension = HL_DIMENSION_RATIO, .flags = HL_QUANTITY_RESULT | HL_QUANTITY_PERCENT, NO_DEFAULT, NO_RANGE, LIMITS_LOSS,
    .help = N_("Pressure lost in the valve as a part of the inlet pressure; stop and control valves together lose 3-5 %.") },
};

const HlKind hl_kind_valve = {
  .id = "valve", .letter = "V", .name = N_("Throttle valve"), .shelf_name = N_("valve"), .shelf_group = N_("Lines"),
  .help = N_("Lowers the pressure at constant enthalpy: where two pressures meet, or to control."),
  .half_width = 2, .half_height = 1,
  .ports = ROWS (ports), .quantities = ROWS (quantities),
};
