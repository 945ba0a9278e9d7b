/* Rows that exchanger, recuperator and evaporator share: two sides in counterflow.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#pragma once
#include "plant/kinds/kinds.h"

/* What the heat is in the plant's results. */
enum { HL_COUNTS_INSIDE, HL_COUNTS_INPUT, HL_COUNTS_DELIVERED, HL_COUNTS_REJECTED };
static const char *const counts_words[] = { "inside", "input", "delivered", "rejected", NULL };
static const char *const counts_names[] = { N_("passed on inside"), N_("heat input"), N_("heat delivered"), N_("heat rejected"), NULL };

#define COUNTS_OPTION(the_usual) \
  { .key = "counts", .name = N_("Heat counts as"), .least = 0, .most = 3, .usual = the_usual, .choices = counts_words, .choice_names = counts_names }

#define HEAT_ROW(the_help) \
  { .key = "heat", .sign = "Q", .name = N_("Heat transferred"), .group = N_("Result"), \
    .dimension = HL_DIMENSION_POWER, .flags = HL_QUANTITY_RESULT, NO_DEFAULT, NO_RANGE, LIMITS_POWER, .yield_rank = 18, .help = the_help }

/* The arguments end each row: the option under which it exists, or nothing. */
#define EXCHANGE_ROWS_WHEN(...) \
  { .key = "hot_outlet.T", .sign = "T", .name = N_("Hot outlet temperature"), .group = N_("Heat transfer"), \
    .dimension = HL_DIMENSION_TEMPERATURE, .flags = HL_QUANTITY_RESULT, NO_DEFAULT, NO_RANGE, LIMITS_TEMPERATURE, .yield_rank = 15, \
    .help = N_("Temperature of the hot side as it leaves; another way to say the pinch."), __VA_ARGS__ }, \
  { .key = "cold_outlet.T", .sign = "T", .name = N_("Cold outlet temperature"), .group = N_("Heat transfer"), \
    .dimension = HL_DIMENSION_TEMPERATURE, .flags = HL_QUANTITY_RESULT, NO_DEFAULT, NO_RANGE, LIMITS_TEMPERATURE, .yield_rank = 15, \
    .help = N_("Temperature of the cold side as it leaves; another way to say the pinch."), __VA_ARGS__ }, \
  { .key = "hot_end_difference", .sign = "ΔT", .name = N_("Hot end difference"), .group = N_("Heat transfer"), \
    .dimension = HL_DIMENSION_TEMPERATURE_DIFFERENCE, .flags = HL_QUANTITY_RESULT, NO_DEFAULT, NO_RANGE, LIMITS (-1000.0, 3000.0), .yield_rank = 16, \
    .help = N_("Hot inlet temperature minus cold outlet temperature."), __VA_ARGS__ }, \
  { .key = "cold_end_difference", .sign = "ΔT", .name = N_("Cold end difference"), .group = N_("Heat transfer"), \
    .dimension = HL_DIMENSION_TEMPERATURE_DIFFERENCE, .flags = HL_QUANTITY_RESULT, NO_DEFAULT, NO_RANGE, LIMITS (-1000.0, 3000.0), .yield_rank = 16, \
    .help = N_("Hot outlet temperature minus cold inlet temperature."), __VA_ARGS__ }, \
  { .key = "effectiveness", .sign = "ε", .name = N_("Effectiveness"), .group = N_("Heat transfer"), \
    .dimension = HL_DIMENSION_RATIO, .flags = HL_QUANTITY_RESULT, NO_DEFAULT, RANGE (0.3, 0.97), LIMITS_FRACTION, .yield_rank = 17, \
    .help = N_("Heat over what would pass if the stream that can take less left at the other's inlet temperature; a pinch inside may forbid to reach 1."), __VA_ARGS__ }, \
  { .key = "UA", .sign = "UA", .name = N_("Conductance"), .group = N_("Result"), \
    .dimension = HL_DIMENSION_CONDUCTANCE, .flags = HL_QUANTITY_RESULT, NO_DEFAULT, NO_RANGE, LIMITS_CONDUCTANCE, .yield_rank = 19, \
    .help = N_("Heat transfer coefficient times area, summed over 24 parts of equal heat, cut again where a stream begins or ends to boil or condense."), __VA_ARGS__ }

#define EXCHANGE_ROWS EXCHANGE_ROWS_WHEN (), HEAT_ROW (N_("Heat that passes from the hot to the cold side."))

#define PINCH_ROW(value, source) PINCH_ROW_WHEN (value, source, )
#define PINCH_ROW_WHEN(value, source, ...) \
  { .key = "pinch", .sign = "ΔT_min", .name = N_("Pinch"), .group = N_("Heat transfer"), \
    .dimension = HL_DIMENSION_TEMPERATURE_DIFFERENCE, .flags = HL_QUANTITY_ASSUMED | HL_QUANTITY_USUAL, \
    DEFAULT (value, source), RANGE (3.0, 60.0), LIMITS (-1000.0, 3000.0), .yield_rank = 10, \
    .help = N_("Least temperature difference between the two sides, wherever it lies."), __VA_ARGS__ }

#define SIDE_LOSS_ROW(the_key, the_name, the_help, value, source) SIDE_LOSS_ROW_WHEN (the_key, the_name, the_help, value, source, )
#define SIDE_LOSS_ROW_WHEN(the_key, the_name, the_help, value, source, ...) \
  { .key = the_key, .sign = "Δp/p", .name = the_name, .group = N_("Losses"), \
    .dimension = HL_DIMENSION_RATIO, .flags = HL_QUANTITY_ASSUMED | HL_QUANTITY_PERCENT, \
    DEFAULT (value, source), RANGE (0.0, 0.1), LIMITS_LOSS, .yield_rank = 60, .help = the_help, __VA_ARGS__ }

#define SIDE_PORTS \
  { .key = "hot_inlet", .name = N_("hot inlet"), .direction = HL_PORT_IN, .side = HL_SIDE_UP, .x = 0, .y = -2 }, \
  { .key = "hot_outlet", .name = N_("hot outlet"), .direction = HL_PORT_OUT, .side = HL_SIDE_DOWN, .x = 0, .y = 2 }, \
  { .key = "cold_inlet", .name = N_("cold inlet"), .direction = HL_PORT_IN, .side = HL_SIDE_RIGHT, .x = 2, .y = 0, .side_circuit = 1 }, \
  { .key = "cold_outlet", .name = N_("cold outlet"), .direction = HL_PORT_OUT, .side = HL_SIDE_LEFT, .x = -2, .y = 0, .side_circuit = 1 }
