/* Closed feed heater: steam condenses round the tubes, drains may cascade into it.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "plant/kinds/kinds.h"

static const HlPortKind ports[] = {
  { .key = "steam", .name = N_("heating steam inlet"), .direction = HL_PORT_IN, .side = HL_SIDE_UP, .x = 0, .y = -2 },
  { .key = "drain", .name = N_("drain outlet"), .direction = HL_PORT_OUT, .side = HL_SIDE_DOWN, .x = 0, .y = 2 },
  { .key = "feed_inlet", .name = N_("feed water inlet"), .direction = HL_PORT_IN, .side = HL_SIDE_RIGHT, .x = 2, .y = 0, .side_circuit = 1 },
  { .key = "feed_outlet", .name = N_("feed water outlet"), .direction = HL_PORT_OUT, .side = HL_SIDE_LEFT, .x = -2, .y = 0, .side_circuit = 1 },
  { .key = "drain_inlet", .name = N_("drain inlet"), .direction = HL_PORT_IN, .side = HL_SIDE_LEFT, .x = -2, .y = -1, .is_optional = TRUE },
};

static const HlQuantityKind quantities[] = {
  { .key = "terminal_difference", .sign = "TTD", .name = N_("Terminal temperature difference"), .group = N_("Heat transfer"),
    .dimension = HL_DIMENSION_TEMPERATURE_DIFFERENCE, .flags = HL_QUANTITY_ASSUMED | HL_QUANTITY_USUAL,
    DEFAULT (3.0, N_("3-5 °F from a secondary text, wider range common practice; with a desuperheating zone -2 to 2 K")),
    RANGE (-2.0, 6.0), LIMITS (-100.0, 500.0), .yield_rank = 10,
    .help = N_("Saturation temperature of the shell minus feed outlet temperature; negative where superheat is used.") },
  { .key = "drain_approach", .sign = "DCA", .name = N_("Drain cooler approach"), .group = N_("Heat transfer"),
    .dimension = HL_DIMENSION_TEMPERATURE_DIFFERENCE, .flags = HL_QUANTITY_ASSUMED | HL_QUANTITY_USUAL,
    DEFAULT (5.6, N_("5-10 °F from a secondary text; HEI Standards for Closed Feedwater Heaters, from memory")),
    RANGE (2.8, 10.0), LIMITS (0.0, 500.0), .yield_rank = 12,
    .help = N_("Drain temperature minus feed inlet temperature.") },
  { .key = "drain_subcooling", .sign = "ΔT", .name = N_("Drain subcooling"), .group = N_("Heat transfer"),
    .dimension = HL_DIMENSION_TEMPERATURE_DIFFERENCE, .flags = HL_QUANTITY_RESULT, NO_DEFAULT, NO_RANGE, LIMITS_DIFFERENCE, .yield_rank = 13,
    .help = N_("Saturation temperature minus drain temperature; another way to say the drain cooler approach.") },
  { .key = "feed_outlet.T", .sign = "T", .name = N_("Feed outlet temperature"), .group = N_("Heat transfer"),
    .dimension = HL_DIMENSION_TEMPERATURE, .flags = HL_QUANTITY_RESULT, NO_DEFAULT, RANGE (303.15, 593.15), LIMITS_TEMPERATURE, .yield_rank = 14,
    .help = N_("Temperature of the heated feed water; another way to say the terminal difference.") },
  { .key = "feed_pressure_loss", .sign = "Δp/p", .name = N_("Feed pressure loss"), .group = N_("Losses"),
    .dimension = HL_DIMENSION_RATIO, .flags = HL_QUANTITY_ASSUMED | HL_QUANTITY_PERCENT,
    DEFAULT (0.0, N_("simplification, no source: the feed water loses no pressure")),
    RANGE (0.0, 0.05), LIMITS_LOSS, .yield_rank = 60,
    .help = N_("Pressure lost by the feed water as a part of its inlet pressure.") },
  { .key = "saturation_T", .sign = "T'", .name = N_("Saturation temperature"), .group = N_("Result"),
    .dimension = HL_DIMENSION_TEMPERATURE, .flags = HL_QUANTITY_RESULT, NO_DEFAULT, NO_RANGE, LIMITS_TEMPERATURE,
    .help = N_("Saturation temperature at the shell's pressure.") },
  { .key = "heat", .sign = "Q", .name = N_("Heat transferred"), .group = N_("Result"),
    .dimension = HL_DIMENSION_POWER, .flags = HL_QUANTITY_RESULT, NO_DEFAULT, NO_RANGE, LIMITS_POWER,
    .help = N_("Heat that the feed water takes up.") },
  { .key = "UA", .sign = "UA", .name = N_("Conductance"), .group = N_("Result"),
    .dimension = HL_DIMENSION_CONDUCTANCE, .flags = HL_QUANTITY_RESULT, NO_DEFAULT, NO_RANGE, LIMITS_CONDUCTANCE,
    .help = N_("Heat transfer coefficient times area, summed over desuperheating, condensing and drain cooling zones.") },
  ELEVATION
};

static const HlRating ratings[] = { { .frozen = "UA", .found = "terminal_difference" } };

const HlKind hl_kind_closed_heater = {
  .id = "closed_heater", .letter = "H", .name = N_("Closed heater"), .shelf_name = N_("closed heater"), .shelf_group = N_("Feed"),
  .help = N_("Heats feed water in tubes by condensing steam round them; the drain of a hotter heater may come in."),
  .half_width = 2, .half_height = 2,
  .ports = ROWS (ports), .quantities = ROWS (quantities), .ratings = ROWS (ratings),
};
