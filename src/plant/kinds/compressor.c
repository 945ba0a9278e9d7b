/* Compressor for vapour.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "plant/kinds/kinds.h"

static const HlPortKind ports[] = {
  { .key = "inlet", .name = N_("inlet"), .direction = HL_PORT_IN, .side = HL_SIDE_LEFT, .x = -2, .y = 0 },
  { .key = "outlet", .name = N_("outlet"), .direction = HL_PORT_OUT, .side = HL_SIDE_RIGHT, .x = 2, .y = 0 },
};

static const HlQuantityKind quantities[] = {
  { .key = "outlet.p", .sign = "p", .name = N_("Outlet pressure"), .group = N_("Compression"),
    .dimension = HL_DIMENSION_PRESSURE, .flags = HL_QUANTITY_USUAL,
    NO_DEFAULT, RANGE (0.1e5, 200e5), LIMITS_PRESSURE, .yield_rank = 20,
    .help = N_("Pressure at the outlet; mostly the condenser behind it decides it.") },
  { .key = "isentropic_efficiency", .sign = "η", .name = N_("Isentropic efficiency"), .group = N_("Compression"),
    .dimension = HL_DIMENSION_RATIO, .flags = HL_QUANTITY_ASSUMED,
    DEFAULT (0.75, N_("common practice, no source")), RANGE (0.55, 0.88), LIMITS_EFFICIENCY, .yield_rank = 52,
    .help = N_("Enthalpy rise at constant entropy over the enthalpy rise.") },
  { .key = "pressure_ratio", .sign = "p/p", .name = N_("Pressure ratio"), .group = N_("Compression"),
    .dimension = HL_DIMENSION_RATIO, .flags = HL_QUANTITY_RESULT,
    NO_DEFAULT, RANGE (1.1, 12.0), LIMITS (0.0, 1e4), .yield_rank = 21,
    .help = N_("Outlet over inlet pressure.") },
  { .key = "motor_efficiency", .sign = "η_m", .name = N_("Motor efficiency"), .group = N_("Power"),
    .dimension = HL_DIMENSION_RATIO, .flags = HL_QUANTITY_ASSUMED,
    DEFAULT (0.95, N_("common practice, no source; motor classes: IEC 60034-30-1")), RANGE (0.85, 0.97), LIMITS_EFFICIENCY, .yield_rank = 82,
    .help = N_("Shaft power over electrical power; not used where a shaft drives the compressor.") },
  { .key = "power", .sign = "P", .name = N_("Shaft power"), .group = N_("Power"),
    .dimension = HL_DIMENSION_POWER, .flags = HL_QUANTITY_RESULT,
    NO_DEFAULT, NO_RANGE, LIMITS_POWER,
    .help = N_("Power that the compressor takes at its shaft.") },
  { .key = "motor_power", .sign = "P_el", .name = N_("Motor power"), .group = N_("Power"),
    .dimension = HL_DIMENSION_POWER, .flags = HL_QUANTITY_RESULT,
    NO_DEFAULT, NO_RANGE, LIMITS_POWER,
    .help = N_("Electrical power of the motor; 0 where a shaft drives the compressor.") },
};

const HlKind hl_kind_compressor = {
  .id = "compressor", .letter = "K", .name = N_("Compressor"), .shelf_name = N_("compressor"), .shelf_group = N_("Expand"),
  .help = N_("Raises the pressure of vapour, as in a heat pump; driven by a motor unless it sits on a shaft."),
  .shaft = HL_SHAFT_DRIVEN, .half_width = 2, .half_height = 2,
  .ports = ROWS (ports), .quantities = ROWS (quantities),
};
