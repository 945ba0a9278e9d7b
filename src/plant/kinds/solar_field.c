/* Solar field: collectors that heat a liquid or make steam.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "plant/kinds/kinds.h"

static const HlPortKind ports[] = {
  { .key = "inlet", .name = N_("inlet"), .direction = HL_PORT_IN, .side = HL_SIDE_LEFT, .x = -3, .y = 0 },
  { .key = "outlet", .name = N_("outlet"), .direction = HL_PORT_OUT, .side = HL_SIDE_RIGHT, .x = 3, .y = 0 },
};

static const HlQuantityKind quantities[] = {
  { .key = "outlet.T", .sign = "T", .name = N_("Outlet temperature"), .group = N_("Field"),
    .dimension = HL_DIMENSION_TEMPERATURE, .flags = HL_QUANTITY_USUAL | HL_QUANTITY_ASSUMED,
    DEFAULT (663.15, N_("common practice, no source: parabolic troughs with thermal oil end at about 390 °C")), RANGE (323.15, 838.15), LIMITS_TEMPERATURE, .yield_rank = 40,
    .help = N_("Temperature of the medium as it leaves the field.") },
  { .key = "irradiance", .sign = "E", .name = N_("Irradiance"), .group = N_("Field"),
    .dimension = HL_DIMENSION_IRRADIANCE, .flags = HL_QUANTITY_ASSUMED,
    DEFAULT (850.0, N_("common practice, no source: direct normal, a design value of sunny sites")), RANGE (200.0, 1100.0), LIMITS (0.0, 1e5), .yield_rank = 92,
    .help = N_("Power of the sun that a square metre of aperture can use.") },
  { .key = "efficiency", .sign = "η", .name = N_("Field efficiency"), .group = N_("Field"),
    .dimension = HL_DIMENSION_RATIO, .flags = HL_QUANTITY_ASSUMED,
    DEFAULT (0.62, N_("common practice, no source: optical and heat losses together, at design")), RANGE (0.3, 0.78), LIMITS_EFFICIENCY, .yield_rank = 70,
    .help = N_("Heat to the medium over power of the sun on the aperture; a plain ratio that you give, no model of losses.") },
  { .key = "aperture", .sign = "A", .name = N_("Aperture area"), .group = N_("Field"),
    .dimension = HL_DIMENSION_APERTURE, .flags = HL_QUANTITY_RESULT, NO_DEFAULT, NO_RANGE, LIMITS (0.0, 1e9), .yield_rank = 20,
    .help = N_("Area of the collectors.") },
  { .key = "pressure_loss", .sign = "Δp/p", .name = N_("Pressure loss"), .group = N_("Losses"),
    .dimension = HL_DIMENSION_RATIO, .flags = HL_QUANTITY_ASSUMED | HL_QUANTITY_PERCENT,
    DEFAULT (0.2, COMMON_PRACTICE), RANGE (0.0, 0.6), LIMITS_LOSS, .yield_rank = 60,
    .help = N_("Pressure lost as a part of the inlet pressure.") },
  { .key = "heat", .sign = "Q", .name = N_("Heat to the medium"), .group = N_("Result"),
    .dimension = HL_DIMENSION_POWER, .flags = HL_QUANTITY_RESULT, NO_DEFAULT, NO_RANGE, LIMITS_POWER, .yield_rank = 18,
    .help = N_("Heat that the field gives; it counts as heat input.") },
};

const HlKind hl_kind_solar_field = {
  .id = "solar_field", .letter = "SF", .name = N_("Solar field"), .shelf_name = N_("solar field"), .shelf_group = N_("Heat"),
  .help = N_("Collectors that heat a medium: area from heat, irradiance and a given efficiency."),
  .half_width = 3, .half_height = 2,
  .ports = ROWS (ports), .quantities = ROWS (quantities),
};
