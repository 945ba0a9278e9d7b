/* Steam condenser with or without its cooling water.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "plant/kinds/kinds.h"

enum { COOLING_WATER, COOLING_NONE };
static const char *const cooling_words[] = { "water", "none", NULL };
static const char *const cooling_names[] = { N_("water"), N_("not modelled"), NULL };

static const HlOptionKind options[] = {
  { .key = "cooling", .name = N_("Cooling"), .least = 0, .most = 1, .usual = COOLING_WATER,
    .choices = cooling_words, .choice_names = cooling_names },
};

#define WITH_WATER .when_option = "cooling", .when_choice = COOLING_WATER

static const HlPortKind ports[] = {
  { .key = "steam", .name = N_("steam inlet"), .direction = HL_PORT_IN, .side = HL_SIDE_UP, .x = 0, .y = -2 },
  { .key = "drain", .name = N_("drain inlet"), .direction = HL_PORT_IN, .side = HL_SIDE_LEFT, .x = -2, .y = -1, .is_optional = TRUE },
  { .key = "condensate", .name = N_("condensate outlet"), .direction = HL_PORT_OUT, .side = HL_SIDE_DOWN, .x = 0, .y = 2 },
  { .key = "cooling_inlet", .name = N_("cooling water inlet"), .direction = HL_PORT_IN, .side = HL_SIDE_RIGHT, .x = 2, .y = 0,
    .side_circuit = 1, .is_optional = TRUE, WITH_WATER },
  { .key = "cooling_outlet", .name = N_("cooling water outlet"), .direction = HL_PORT_OUT, .side = HL_SIDE_LEFT, .x = -2, .y = 0,
    .side_circuit = 1, .is_optional = TRUE, WITH_WATER },
};

static const HlQuantityKind quantities[] = {
  { .key = "steam.p", .sign = "p", .name = N_("Condenser pressure"), .group = N_("Steam"),
    .dimension = HL_DIMENSION_PRESSURE, .flags = HL_QUANTITY_USUAL,
    DEFAULT (7000.0, N_("UFC 3-540-02N, Steam Power Plants, section 5.3: 1-4 inHg are usual")),
    RANGE (3000.0, 13500.0), LIMITS_PRESSURE, .yield_rank = 10,
    .help = N_("Pressure at the steam inlet; with cooling water it follows from the water and the terminal difference.") },
  { .key = "subcooling", .sign = "ΔT", .name = N_("Condensate subcooling"), .group = N_("Steam"),
    .dimension = HL_DIMENSION_TEMPERATURE_DIFFERENCE, .flags = HL_QUANTITY_ASSUMED,
    DEFAULT (0.0, N_("simplification, no source: condensate leaves saturated")),
    RANGE (0.0, 5.0), LIMITS_DIFFERENCE, .yield_rank = 45,
    .help = N_("How far the condensate leaves below saturation.") },
  { .key = "cooling_inlet_T", .sign = "T", .name = N_("Cooling water inlet temperature"), .group = N_("Cooling water"),
    .dimension = HL_DIMENSION_TEMPERATURE, .flags = HL_QUANTITY_ASSUMED,
    DEFAULT (288.15, N_("a first guess, no source: take the highest expected river temperature, or wet bulb and tower approach")),
    RANGE (273.15, 313.15), LIMITS_TEMPERATURE, .yield_rank = 90,
    .help = N_("Temperature of the cooling water as it arrives."), WITH_WATER },
  { .key = "cooling_rise", .sign = "ΔT", .name = N_("Cooling water rise"), .group = N_("Cooling water"),
    .dimension = HL_DIMENSION_TEMPERATURE_DIFFERENCE, .flags = HL_QUANTITY_ASSUMED,
    DEFAULT (10.0, COMMON_PRACTICE), RANGE (6.0, 14.0), LIMITS (0.0, 200.0), .yield_rank = 20,
    .help = N_("By how much the cooling water warms up."), WITH_WATER },
  { .key = "terminal_difference", .sign = "TTD", .name = N_("Terminal temperature difference"), .group = N_("Cooling water"),
    .dimension = HL_DIMENSION_TEMPERATURE_DIFFERENCE, .flags = HL_QUANTITY_ASSUMED,
    DEFAULT (4.0, N_("common practice, no source; not below 2.8 K: HEI Standards for Steam Surface Condensers, from memory")),
    RANGE (2.8, 8.0), LIMITS (0.0, 500.0), .yield_rank = 10,
    .help = N_("Saturation temperature of the steam minus cooling water outlet temperature."), WITH_WATER },
  { .key = "cooling_p", .sign = "p", .name = N_("Cooling water pressure"), .group = N_("Cooling water"),
    .dimension = HL_DIMENSION_PRESSURE, .flags = HL_QUANTITY_ASSUMED,
    DEFAULT (2e5, COMMON_PRACTICE), RANGE (1e5, 10e5), LIMITS_PRESSURE, .yield_rank = 92,
    .help = N_("Pressure of the cooling water at its inlet; not used where a line is connected there."), WITH_WATER },
  { .key = "cooling_pressure_loss", .sign = "Δp/p", .name = N_("Cooling water pressure loss"), .group = N_("Cooling water"),
    .dimension = HL_DIMENSION_RATIO, .flags = HL_QUANTITY_ASSUMED | HL_QUANTITY_PERCENT,
    DEFAULT (0.0, N_("simplification, no source: the cooling water loses no pressure")),
    RANGE (0.0, 0.5), LIMITS_LOSS, .yield_rank = 91,
    .help = N_("Pressure lost by the cooling water as a part of its inlet pressure."), WITH_WATER },
  { .key = "heat", .sign = "Q", .name = N_("Heat rejected"), .group = N_("Result"),
    .dimension = HL_DIMENSION_POWER, .flags = HL_QUANTITY_RESULT, NO_DEFAULT, NO_RANGE, LIMITS_POWER,
    .help = N_("Heat that leaves the steam side.") },
  { .key = "cooling_flow", .sign = "m", .name = N_("Cooling water flow"), .group = N_("Result"),
    .dimension = HL_DIMENSION_MASS_FLOW, .flags = HL_QUANTITY_RESULT, NO_DEFAULT, NO_RANGE, LIMITS_FLOW,
    .help = N_("Mass flow of the cooling water."), WITH_WATER },
  { .key = "log_mean_difference", .sign = "LMTD", .name = N_("Log mean temperature difference"), .group = N_("Result"),
    .dimension = HL_DIMENSION_TEMPERATURE_DIFFERENCE, .flags = HL_QUANTITY_RESULT, NO_DEFAULT, NO_RANGE, LIMITS (0.0, 1000.0),
    .help = N_("Logarithmic mean of the differences between saturation and cooling water at both ends."), WITH_WATER },
  { .key = "UA", .sign = "UA", .name = N_("Conductance"), .group = N_("Result"),
    .dimension = HL_DIMENSION_CONDUCTANCE, .flags = HL_QUANTITY_RESULT, NO_DEFAULT, NO_RANGE, LIMITS_CONDUCTANCE,
    .help = N_("Heat transfer coefficient times area: heat over log mean temperature difference."), WITH_WATER },
  { .key = "cleanliness", .sign = "F_c", .name = N_("Cleanliness factor"), .group = N_("Result"),
    .dimension = HL_DIMENSION_RATIO, .flags = HL_QUANTITY_ASSUMED,
    DEFAULT (0.85, N_("HEI, quoted from a secondary text: copper alloys 0.85, titanium and stainless steel 0.90")),
    RANGE (0.7, 0.95), LIMITS (0.0, 1.0), .yield_rank = 5,
    .help = N_("Conductance as it is in service over that of clean tubes."), WITH_WATER },
  { .key = "clean_UA", .sign = "UA_c", .name = N_("Clean conductance"), .group = N_("Result"),
    .dimension = HL_DIMENSION_CONDUCTANCE, .flags = HL_QUANTITY_RESULT, NO_DEFAULT, NO_RANGE, LIMITS_CONDUCTANCE,
    .help = N_("Conductance of the same surface with clean tubes: what it must be bought for."), WITH_WATER },
  ELEVATION
};

static const HlRating ratings[] = { { .frozen = "UA", .found = "terminal_difference" } };

const HlKind hl_kind_condenser = {
  .id = "condenser", .letter = "C", .name = N_("Condenser"), .shelf_name = N_("condenser"), .shelf_group = N_("Condense"),
  .help = N_("Condenses exhaust steam; cooling water is counted inside or comes through its own lines."),
  .half_width = 2, .half_height = 2,
  .ports = ROWS (ports), .options = ROWS (options), .quantities = ROWS (quantities), .ratings = ROWS (ratings),
};
