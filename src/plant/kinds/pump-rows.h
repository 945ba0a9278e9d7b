/* Ports and quantities that all pumps have.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#pragma once
#include "plant/kinds/kinds.h"

#define PUMP_PORTS \
  { .key = "inlet", .name = N_("inlet"), .direction = HL_PORT_IN, .side = HL_SIDE_LEFT, .x = -2, .y = 0 }, \
  { .key = "outlet", .name = N_("outlet"), .direction = HL_PORT_OUT, .side = HL_SIDE_RIGHT, .x = 2, .y = 0 },

#define PUMP_DELIVERY(efficiency, efficiency_source) \
  { .key = "outlet.p", .sign = "p", .name = N_("Outlet pressure"), .group = N_("Delivery"), \
    .dimension = HL_DIMENSION_PRESSURE, .flags = HL_QUANTITY_USUAL, \
    NO_DEFAULT, RANGE (0.5e5, 400e5), LIMITS_PRESSURE, .yield_rank = 20, \
    .help = N_("Pressure at the outlet; mostly what lies behind the pump decides it.") }, \
  { .key = "isentropic_efficiency", .sign = "η", .name = N_("Isentropic efficiency"), .group = N_("Delivery"), \
    .dimension = HL_DIMENSION_RATIO, .flags = HL_QUANTITY_ASSUMED, \
    DEFAULT (efficiency, efficiency_source), \
    RANGE (0.40, 0.87), LIMITS_EFFICIENCY, .yield_rank = 52, \
    .help = N_("Enthalpy rise at constant entropy over the enthalpy rise.") },

enum { SUCTION_NONE, SUCTION_CHECKED };
#define PUMP_SUCTION_WORDS \
static const char *const suction_words[] = { "not checked", "checked", NULL }; \
static const char *const suction_names[] = { N_("not checked"), N_("checked"), NULL };
#define PUMP_SUCTION_OPTION \
  { .key = "suction", .name = N_("Suction (NPSH)"), .least = 0, .most = 1, .usual = SUCTION_NONE, .choices = suction_words, .choice_names = suction_names },
#define WITH_SUCTION .when_option = "suction", .when_choice = SUCTION_CHECKED

#define PUMP_SUCTION(required, required_source) \
  { .key = "elevation", .sign = "z", .name = N_("Elevation"), .group = N_("Suction"), \
    .dimension = HL_DIMENSION_LENGTH, .flags = HL_QUANTITY_ASSUMED, DEFAULT (0.0, N_("a first guess, no source: on the floor")), \
    RANGE (-20.0, 60.0), LIMITS (-1e4, 1e4), .yield_rank = 95, .help = N_("Height of the pump's axis above the plant's floor."), WITH_SUCTION }, \
  { .key = "static_head", .sign = "H_z", .name = N_("Static head"), .group = N_("Suction"), \
    .dimension = HL_DIMENSION_LENGTH, .flags = HL_QUANTITY_ASSUMED, DEFAULT (5.0, N_("an example, no source: the arrangement decides")), \
    RANGE (-5.0, 60.0), LIMITS (-1e4, 1e4), .yield_rank = 10, \
    .help = N_("Level of the vessel that the pump draws from above its axis; found from both elevations where the vessel has one."), WITH_SUCTION }, \
  { .key = "suction_loss", .sign = "H_v", .name = N_("Loss of suction line"), .group = N_("Suction"), \
    .dimension = HL_DIMENSION_LENGTH, .flags = HL_QUANTITY_ASSUMED, DEFAULT (0.5, N_("a first guess, no source")), \
    RANGE (0.1, 3.0), LIMITS (HL_FROM_ZERO, 1e3), .yield_rank = 60, .help = N_("Friction of the suction line as a head."), WITH_SUCTION }, \
  { .key = "npsh_required", .sign = "NPSHR", .name = N_("NPSH required"), .group = N_("Suction"), \
    .dimension = HL_DIMENSION_LENGTH, .flags = HL_QUANTITY_ASSUMED, DEFAULT (required, required_source), \
    RANGE (0.5, 15.0), LIMITS (0.0, 1e3), .yield_rank = 96, .help = N_("What the maker asks for, so that the pump does not cavitate."), WITH_SUCTION }, \
  { .key = "npsh_available", .sign = "NPSHA", .name = N_("NPSH available"), .group = N_("Suction"), \
    .dimension = HL_DIMENSION_LENGTH, .flags = HL_QUANTITY_RESULT, NO_DEFAULT, NO_RANGE, LIMITS (-1e4, 1e5), .yield_rank = 30, \
    .help = N_("Static head less losses, and the pressure above saturation as a head."), WITH_SUCTION },

#define PUMP_POWER \
  { .key = "motor_efficiency", .sign = "η_m", .name = N_("Motor efficiency"), .group = N_("Power"), \
    .dimension = HL_DIMENSION_RATIO, .flags = HL_QUANTITY_ASSUMED, \
    DEFAULT (0.95, N_("common practice, no source; motor classes: IEC 60034-30-1")), \
    RANGE (0.85, 0.97), LIMITS_EFFICIENCY, .yield_rank = 82, \
    .help = N_("Shaft power over electrical power; not used where a shaft drives the pump.") }, \
  { .key = "pressure_rise", .sign = "Δp", .name = N_("Pressure rise"), .group = N_("Delivery"), \
    .dimension = HL_DIMENSION_PRESSURE_DIFFERENCE, .flags = HL_QUANTITY_RESULT, NO_DEFAULT, NO_RANGE, LIMITS (HL_FROM_ZERO, 1e9), \
    .help = N_("Outlet pressure minus inlet pressure.") }, \
  { .key = "power", .sign = "P", .name = N_("Shaft power"), .group = N_("Power"), \
    .dimension = HL_DIMENSION_POWER, .flags = HL_QUANTITY_RESULT, NO_DEFAULT, NO_RANGE, LIMITS_POWER, \
    .help = N_("Power that the pump takes at its shaft.") }, \
  { .key = "motor_power", .sign = "P_el", .name = N_("Motor power"), .group = N_("Power"), \
    .dimension = HL_DIMENSION_POWER, .flags = HL_QUANTITY_RESULT, NO_DEFAULT, NO_RANGE, LIMITS_POWER, \
    .help = N_("Electrical power of the motor; 0 where a shaft drives the pump.") },
