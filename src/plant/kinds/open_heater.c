/* Open heater or deaerator: steam and waters mix at one pressure.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "plant/kinds/kinds.h"

enum { VENT_NONE, VENT_COUNTED };
static const char *const vent_words[] = { "none", "counted", NULL };
static const char *const vent_names[] = { N_("not counted"), N_("counted"), NULL };

static const HlOptionKind options[] = {
  { .key = "inlets", .name = N_("Water inlets"), .least = 1, .most = 6, .usual = 1 },
  { .key = "vent", .name = N_("Vent"), .least = 0, .most = 1, .usual = VENT_NONE, .choices = vent_words, .choice_names = vent_names },
};

#define WITH_VENT .when_option = "vent", .when_choice = VENT_COUNTED

static const HlPortPlace inlet_places[] = {
  { 3, 0, HL_SIDE_RIGHT }, { -3, 0, HL_SIDE_LEFT }, { 3, 1, HL_SIDE_RIGHT },
  { -3, 1, HL_SIDE_LEFT }, { 3, -1, HL_SIDE_RIGHT }, { -3, -1, HL_SIDE_LEFT },
};

static const HlPortKind ports[] = {
  { .key = "steam", .name = N_("heating steam inlet"), .direction = HL_PORT_IN, .side = HL_SIDE_UP, .x = 0, .y = -3 },
  { .key = "inlet#", .name = N_("water inlet"), .direction = HL_PORT_IN, .side = HL_SIDE_RIGHT, .x = 3, .y = 0,
    .repeat = "inlets", .places = inlet_places },
  { .key = "outlet", .name = N_("feed water outlet"), .direction = HL_PORT_OUT, .side = HL_SIDE_DOWN, .x = 0, .y = 3 },
};

static const HlQuantityKind quantities[] = {
  { .key = "steam.p", .sign = "p", .name = N_("Vessel pressure"), .group = N_("Vessel"),
    .dimension = HL_DIMENSION_PRESSURE, .flags = HL_QUANTITY_USUAL,
    DEFAULT (1.4e5, N_("industrial deaerators 1.2-2.05 bar: FED-STD W-H-2904, 3-15 psig; utility 3-12 bar: common practice, no source")),
    RANGE (1.2e5, 12e5), LIMITS_PRESSURE, .yield_rank = 20,
    .help = N_("The one pressure of the vessel and of all its ports.") },
  { .key = "outlet_subcooling", .sign = "ΔT", .name = N_("Outlet subcooling"), .group = N_("Vessel"),
    .dimension = HL_DIMENSION_TEMPERATURE_DIFFERENCE, .flags = HL_QUANTITY_ASSUMED,
    DEFAULT (0.0, N_("UFC 3-540-02N, Steam Power Plants: a deaerator's outlet is saturated")),
    RANGE (0.0, 10.0), LIMITS_DIFFERENCE, .yield_rank = 46,
    .help = N_("How far the feed water leaves below saturation; a deaerator must reach 0.") },
  { .key = "vent_fraction", .sign = "m/m", .name = N_("Vent of outlet flow"), .group = N_("Vent"),
    .dimension = HL_DIMENSION_RATIO, .flags = HL_QUANTITY_ASSUMED | HL_QUANTITY_PERCENT,
    /* xgettext:no-c-format */
    DEFAULT (0.001, N_("0.1 % of the flow, quoted from a secondary text")), RANGE (0.0005, 0.005), LIMITS_FRACTION, .yield_rank = 60,
    .help = N_("Steam let off with the gases over the feed water that leaves."), WITH_VENT },
  { .key = "vent_flow", .sign = "m", .name = N_("Vent steam"), .group = N_("Vent"),
    .dimension = HL_DIMENSION_MASS_FLOW, .flags = HL_QUANTITY_RESULT, NO_DEFAULT, NO_RANGE, LIMITS_FLOW,
    .help = N_("Saturated steam that leaves at the vent and is lost."), WITH_VENT },
  { .key = "heat", .sign = "Q", .name = N_("Heat from steam"), .group = N_("Result"),
    .dimension = HL_DIMENSION_POWER, .flags = HL_QUANTITY_RESULT, NO_DEFAULT, NO_RANGE, LIMITS_POWER,
    .help = N_("Steam flow times the fall of its enthalpy down to that of the outlet.") },
  ELEVATION
};

const HlKind hl_kind_open_heater = {
  .id = "open_heater", .letter = "D", .name = N_("Open heater, deaerator"), .shelf_name = N_("open heater"), .shelf_group = N_("Feed"),
  .help = N_("Heats water by mixing it with steam, at one pressure."),
  .half_width = 3, .half_height = 3,
  .ports = ROWS (ports), .options = ROWS (options), .quantities = ROWS (quantities),
};
