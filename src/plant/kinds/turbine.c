/* Turbine section with any number of extractions.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "plant/kinds/kinds.h"

static const char *const expansion_words[] = { "by group", "straight line", NULL };
static const char *const expansion_names[] = { N_("by group"), N_("straight line"), NULL };

enum { WETNESS_NONE, WETNESS_BAUMANN };
static const char *const wetness_words[] = { "none", "Baumann", NULL };
static const char *const wetness_names[] = { N_("not corrected"), N_("by Baumann's rule"), NULL };

enum { LOSS_NONE, LOSS_COUNTED };
static const char *const loss_words[] = { "none", "counted", NULL };
static const char *const loss_names[] = { N_("none"), N_("counted"), NULL };

#define WITH_BAUMANN .when_option = "wetness", .when_choice = WETNESS_BAUMANN
#define WITH_LOSS    .when_option = "leaving_loss", .when_choice = LOSS_COUNTED

static const HlOptionKind options[] = {
  { .key = "extractions", .name = N_("Extractions"), .least = 0, .most = 8, .usual = 0 },
  { .key = "expansion", .name = N_("Expansion"), .least = 0, .most = 1, .usual = 0,
    .choices = expansion_words, .choice_names = expansion_names },
  { .key = "wetness", .name = N_("Moisture correction"), .least = 0, .most = 1, .usual = WETNESS_NONE,
    .choices = wetness_words, .choice_names = wetness_names },
  { .key = "leaving_loss", .name = N_("Exhaust loss"), .least = 0, .most = 1, .usual = LOSS_NONE,
    .choices = loss_words, .choice_names = loss_names },
};

static const HlPortKind ports[] = {
  { .key = "inlet", .name = N_("steam inlet"), .direction = HL_PORT_IN, .side = HL_SIDE_UP, .x = 0, .y = -1,
    .anchor = HL_ANCHOR_LEFT_EDGE },
  { .key = "extraction#", .name = N_("extraction"), .direction = HL_PORT_OUT, .side = HL_SIDE_DOWN, .x = 2, .y = 3,
    .repeat = "extractions", .anchor = HL_ANCHOR_LEFT_EDGE, .step_x = 2 },
  { .key = "exhaust", .name = N_("exhaust"), .direction = HL_PORT_OUT, .side = HL_SIDE_DOWN, .x = 0, .y = 3,
    .anchor = HL_ANCHOR_RIGHT_EDGE },
};

static const double extraction_pressures[] = { 6e5, 2.5e5, 1.25e5, 0.625e5, 0.3125e5, 0.15625e5, 0.078125e5, 0.0390625e5 };

static const HlQuantityKind quantities[] = {
  { .key = "inlet.p", .sign = "p", .name = N_("Inlet pressure"), .group = N_("Steam"),
    .dimension = HL_DIMENSION_PRESSURE, .flags = HL_QUANTITY_USUAL | HL_QUANTITY_ASSUMED,
    DEFAULT (65e5, N_("common practice, no source: industrial sets run at 40 to 100 bar")),
    RANGE (0.5e5, 300e5), LIMITS_PRESSURE, .yield_rank = 30,
    .help = N_("Pressure of the steam at the turbine flange.") },
  { .key = "extraction#.p", .sign = "p", .name = N_("Extraction pressure"), .group = N_("Steam"),
    .dimension = HL_DIMENSION_PRESSURE, .flags = HL_QUANTITY_USUAL | HL_QUANTITY_ASSUMED,
    DEFAULT (6e5, N_("a first guess, no source: 6 bar, then 2.5 bar, then half of the one before")),
    RANGE (0.1e5, 100e5), LIMITS_PRESSURE, .yield_rank = 15,
    .help = N_("Pressure at the flange of this extraction; extractions are numbered along the expansion."),
    .repeat = "extractions", .numbered_defaults = extraction_pressures },
  { .key = "exhaust.p", .sign = "p", .name = N_("Exhaust pressure"), .group = N_("Steam"),
    .dimension = HL_DIMENSION_PRESSURE, .flags = HL_QUANTITY_USUAL,
    NO_DEFAULT, RANGE (2500.0, 100e5), LIMITS_PRESSURE, .yield_rank = 20,
    .help = N_("Pressure at the exhaust flange; mostly the condenser or the back-pressure network decides it.") },
  { .key = "isentropic_efficiency", .sign = "η", .name = N_("Isentropic efficiency"), .group = N_("Expansion"),
    .dimension = HL_DIMENSION_RATIO, .flags = HL_QUANTITY_ASSUMED,
    DEFAULT (0.83, N_("common practice, no source: 5-50 MW industrial sets; below 1 MW 0.60, large sections 0.87 to 0.92")),
    RANGE (0.40, 0.95), LIMITS_EFFICIENCY, .yield_rank = 50,
    .help = N_("Enthalpy drop over the drop at constant entropy; serves every group that has no efficiency of its own.") },
  { .key = "group_efficiency#", .sign = "η", .name = N_("Efficiency of group"), .group = N_("Expansion"),
    .dimension = HL_DIMENSION_RATIO, .flags = 0,
    NO_DEFAULT, RANGE (0.40, 0.95), LIMITS_EFFICIENCY, .yield_rank = 51,
    .help = N_("Isentropic efficiency from one extraction to the next; overrides the efficiency of the section."),
    .repeat = "extractions", .repeat_extra = 1 },
  { .key = "baumann_factor", .sign = "a", .name = N_("Baumann factor"), .group = N_("Expansion"),
    .dimension = HL_DIMENSION_RATIO, .flags = HL_QUANTITY_ASSUMED,
    DEFAULT (1.0, N_("Baumann 1921; measured values scatter from 0.4 to 2.5: Senoo and White 2017, quoted from a secondary text")),
    RANGE (0.4, 2.5), LIMITS (HL_FROM_ZERO, 5.0), .yield_rank = 55,
    .help = N_("Efficiency lost in the wet part for each part of mean moisture; the isentropic efficiency is then that of dry steam."), WITH_BAUMANN },
  { .key = "overall_efficiency", .sign = "η", .name = N_("Efficiency with moisture"), .group = N_("Expansion"),
    .dimension = HL_DIMENSION_RATIO, .flags = HL_QUANTITY_RESULT, NO_DEFAULT, NO_RANGE, LIMITS_EFFICIENCY, .yield_rank = 54,
    .help = N_("Isentropic efficiency from inlet to the end of the expansion, moisture counted, exhaust loss not."), WITH_BAUMANN },
  { .key = "exhaust_loss", .sign = "Δh", .name = N_("Exhaust loss"), .group = N_("Expansion"),
    .dimension = HL_DIMENSION_ENTHALPY, .flags = HL_QUANTITY_ASSUMED,
    DEFAULT (25e3, N_("an example, no source; by definition half the square of the leaving velocity: 45 kJ/kg at 300 m/s")),
    RANGE (5e3, 60e3), LIMITS (HL_FROM_ZERO, 5e5), .yield_rank = 56,
    .help = N_("Energy of the steam that leaves the last blades and turns back into heat: exhaust enthalpy minus that at the end of the expansion."), WITH_LOSS },
  { .key = "expansion_end_h", .sign = "h", .name = N_("Enthalpy at the end of the expansion"), .group = N_("Expansion"),
    .dimension = HL_DIMENSION_ENTHALPY, .flags = HL_QUANTITY_RESULT, NO_DEFAULT, NO_RANGE, LIMITS (-1e7, 1e7), .yield_rank = 57,
    .help = N_("Where the expansion line ends, before the exhaust loss."), WITH_LOSS },
  { .key = "flow_constant#", .sign = "K", .name = N_("Flow constant of group"), .group = N_("Size"),
    .dimension = HL_DIMENSION_AREA, .flags = HL_QUANTITY_RESULT, NO_DEFAULT, NO_RANGE, LIMITS (0.0, 1e6), .yield_rank = 58,
    .help = N_("Size of the group by the ellipse law: flow over √((p1² - p2²)/(p1 v1)); given, it finds the pressure before the group."),
    .repeat = "extractions", .repeat_extra = 1 },
  { .key = "mechanical_efficiency", .sign = "η_m", .name = N_("Mechanical efficiency"), .group = N_("Power"),
    .dimension = HL_DIMENSION_RATIO, .flags = HL_QUANTITY_ASSUMED,
    DEFAULT (0.985, N_("Dixon and Hall, quoted from a secondary text: 0.95 for a few kW to 0.99 for large sets")),
    RANGE (0.94, 0.998), LIMITS_EFFICIENCY, .yield_rank = 80,
    .help = N_("Shaft power over internal power: bearings and seals.") },
  { .key = "exhaust.x", .sign = "x", .name = N_("Exhaust quality"), .group = N_("Expansion"),
    .dimension = HL_DIMENSION_RATIO, .flags = HL_QUANTITY_RESULT, NO_DEFAULT, NO_RANGE, LIMITS_FRACTION,
    .help = N_("Vapour mass fraction at the exhaust; none where the exhaust is superheated.") },
  { .key = "exhaust_moisture", .sign = "y", .name = N_("Exhaust moisture"), .group = N_("Expansion"),
    .dimension = HL_DIMENSION_RATIO, .flags = HL_QUANTITY_RESULT | HL_QUANTITY_PERCENT, NO_DEFAULT, RANGE (0.0, 0.12), LIMITS_FRACTION,
    .help = N_("Liquid mass fraction at the end of the expansion, before any exhaust loss: 1 - x where it is wet, otherwise 0.") },
  { .key = "internal_power", .sign = "P_i", .name = N_("Internal power"), .group = N_("Power"),
    .dimension = HL_DIMENSION_POWER, .flags = HL_QUANTITY_RESULT, NO_DEFAULT, NO_RANGE, LIMITS_POWER,
    .help = N_("Power that the steam gives to the rotor.") },
  { .key = "power", .sign = "P", .name = N_("Shaft power"), .group = N_("Power"),
    .dimension = HL_DIMENSION_POWER, .flags = HL_QUANTITY_RESULT, NO_DEFAULT, NO_RANGE, LIMITS_POWER,
    .help = N_("Internal power times mechanical efficiency.") },
};

static const HlRating ratings[] = {
  { .frozen = "flow_constant1", .found = "inlet.p" },
  { .frozen = "flow_constant#", .found = "extraction#.p", .repeat = "extractions", .frozen_ahead = 1 },
};

const HlKind hl_kind_turbine = {
  .id = "turbine", .letter = "T", .name = N_("Turbine section"), .shelf_name = N_("turbine"), .shelf_group = N_("Expand"),
  .help = N_("Expands steam and drives a shaft; steam may be extracted on the way."),
  .shaft = HL_SHAFT_DRIVES, .half_width = 2, .half_height = 3, .widen_per = 1, .widen_option = "extractions",
  .ports = ROWS (ports), .options = ROWS (options), .quantities = ROWS (quantities), .ratings = ROWS (ratings),
};
