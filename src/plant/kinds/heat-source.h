/* Rows that the heat input and the fired boiler share: feed, steam and reheat sides.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#pragma once
#include "plant/kinds/kinds.h"

#define REHEAT_OPTION \
  { .key = "reheats", .name = N_("Reheats"), .least = 0, .most = 2, .usual = 0 }

static const HlPortPlace cold_reheat_places[] = { { 3, 1, HL_SIDE_RIGHT }, { -3, 1, HL_SIDE_LEFT } };
static const HlPortPlace hot_reheat_places[] = { { 3, -1, HL_SIDE_RIGHT }, { -3, -1, HL_SIDE_LEFT } };

#define HEAT_SOURCE_PORTS \
  { .key = "feed", .name = N_("feed inlet"), .direction = HL_PORT_IN, .side = HL_SIDE_DOWN, .x = 0, .y = 3 }, \
  { .key = "steam", .name = N_("steam outlet"), .direction = HL_PORT_OUT, .side = HL_SIDE_UP, .x = 0, .y = -3 }, \
  { .key = "cold_reheat#", .name = N_("cold reheat inlet"), .direction = HL_PORT_IN, .side = HL_SIDE_RIGHT, .x = 3, .y = 1, \
    .side_circuit = 1, .repeat = "reheats", .places = cold_reheat_places }, \
  { .key = "hot_reheat#", .name = N_("hot reheat outlet"), .direction = HL_PORT_OUT, .side = HL_SIDE_RIGHT, .x = 3, .y = -1, \
    .side_circuit = 1, .repeat = "reheats", .places = hot_reheat_places }

#define STEAM_ROWS \
  { .key = "steam.T", .sign = "T", .name = N_("Steam temperature"), .group = N_("Steam"), \
    .dimension = HL_DIMENSION_TEMPERATURE, .flags = HL_QUANTITY_USUAL | HL_QUANTITY_ASSUMED, \
    DEFAULT (758.15, N_("common practice, no source: 485 °C, industrial live steam in low-alloy steel")), \
    RANGE (373.15, 893.15), LIMITS_TEMPERATURE, .yield_rank = 40, \
    .help = N_("Temperature of the live steam at the outlet.") }, \
  { .key = "hot_reheat#.T", .sign = "T", .name = N_("Reheat temperature"), .group = N_("Reheat"), \
    .dimension = HL_DIMENSION_TEMPERATURE, .flags = HL_QUANTITY_USUAL | HL_QUANTITY_ASSUMED, \
    DEFAULT (758.15, N_("common practice, no source: as the live steam")), \
    RANGE (473.15, 893.15), LIMITS_TEMPERATURE, .yield_rank = 41, \
    .help = N_("Temperature of the steam that leaves this reheater."), .repeat = "reheats" }

#define REHEAT_LOSS_ROW \
  { .key = "reheat_pressure_loss#", .sign = "Δp/p", .name = N_("Reheat pressure loss"), .group = N_("Reheat"), \
    .dimension = HL_DIMENSION_RATIO, .flags = HL_QUANTITY_ASSUMED | HL_QUANTITY_PERCENT, \
    DEFAULT (0.09, N_("common practice, no source: reheater with both pipes")), \
    RANGE (0.06, 0.12), LIMITS_LOSS, .yield_rank = 61, \
    .help = N_("Pressure lost in this reheater as a part of the cold reheat pressure."), .repeat = "reheats" }

#define HEAT_ROWS \
  { .key = "main_heat", .sign = "Q", .name = N_("Heat to live steam"), .group = N_("Heat"), \
    .dimension = HL_DIMENSION_POWER, .flags = HL_QUANTITY_RESULT, NO_DEFAULT, NO_RANGE, LIMITS_POWER, \
    .help = N_("Heat taken up between feed inlet and steam outlet.") }, \
  { .key = "reheat_heat#", .sign = "Q", .name = N_("Heat to reheat"), .group = N_("Heat"), \
    .dimension = HL_DIMENSION_POWER, .flags = HL_QUANTITY_RESULT, NO_DEFAULT, NO_RANGE, LIMITS_POWER, \
    .help = N_("Heat taken up in this reheater."), .repeat = "reheats" }, \
  { .key = "heat", .sign = "Q", .name = N_("Heat to working fluid"), .group = N_("Heat"), \
    .dimension = HL_DIMENSION_POWER, .flags = HL_QUANTITY_RESULT, NO_DEFAULT, NO_RANGE, LIMITS_POWER, \
    .help = N_("All heat given to the working fluid: live steam and reheat.") }
