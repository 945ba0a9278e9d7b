/* Fired boiler: a heat input with fuel, efficiency and flue gas loss.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "plant/kinds/heat-source.h"

static const HlOptionKind options[] = { REHEAT_OPTION };

static const HlQuantityKind quantities[] = {
  STEAM_ROWS,
  { .key = "pressure_loss", .sign = "Δp/p", .name = N_("Pressure loss"), .group = N_("Losses"),
    .dimension = HL_DIMENSION_RATIO, .flags = HL_QUANTITY_ASSUMED | HL_QUANTITY_PERCENT,
    DEFAULT (0.08, N_("common practice, no source: drum to stop valve")),
    RANGE (0.03, 0.15), LIMITS_LOSS, .yield_rank = 60,
    .help = N_("Pressure lost from feed inlet to steam outlet as a part of the feed pressure.") },
  REHEAT_LOSS_ROW,
  HEAT_ROWS,
  { .key = "efficiency", .sign = "η", .name = N_("Boiler efficiency (LHV)"), .group = N_("Fuel"),
    .dimension = HL_DIMENSION_RATIO, .flags = HL_QUANTITY_ASSUMED,
    DEFAULT (0.90, N_("common practice, no source: gas 0.93, oil 0.91, hard coal 0.90, lignite and wood 0.87, waste 0.83")),
    RANGE (0.79, 0.97), LIMITS (0.0, 1.2), .yield_rank = 70,
    .help = N_("Heat to the working fluid over fuel heat on the lower heating value.") },
  { .key = "fuel_heat", .sign = "Q", .name = N_("Fuel heat (LHV)"), .group = N_("Fuel"),
    .dimension = HL_DIMENSION_POWER, .flags = HL_QUANTITY_RESULT, NO_DEFAULT, NO_RANGE, LIMITS_POWER,
    .help = N_("Fuel flow times lower heating value.") },
  { .key = "fuel_flow", .sign = "m", .name = N_("Fuel flow"), .group = N_("Fuel"),
    .dimension = HL_DIMENSION_MASS_FLOW, .flags = HL_QUANTITY_RESULT, NO_DEFAULT, NO_RANGE, LIMITS_FLOW,
    .help = N_("Mass of fuel burnt in a second.") },
  { .key = "fuel_lhv", .sign = "LHV", .name = N_("Lower heating value"), .group = N_("Fuel"),
    .dimension = HL_DIMENSION_ENTHALPY, .flags = HL_QUANTITY_ASSUMED,
    DEFAULT (48e6, N_("natural gas: IPCC 2006 Guidelines, vol. 2, table 1.2, quoted from a secondary text")),
    RANGE (5e6, 55e6), LIMITS (0.0, 1.5e8), .yield_rank = 95,
    .help = N_("Lower heating value of the fuel as fired.") },
  { .key = "fuel_hhv_ratio", .sign = "HHV/LHV", .name = N_("Higher over lower heating value"), .group = N_("Fuel"),
    .dimension = HL_DIMENSION_RATIO, .flags = HL_QUANTITY_ASSUMED,
    DEFAULT (1.11, N_("natural gas 1.11, diesel oil 1.07, from a secondary text")),
    RANGE (1.0, 1.6), LIMITS (0.999, 5.0), .yield_rank = 96,
    .help = N_("Higher heating value of the fuel divided by the lower one; only efficiencies on the higher heating value need it.") },
  { .key = "flue_loss", .sign = "Q", .name = N_("Boiler losses"), .group = N_("Fuel"),
    .dimension = HL_DIMENSION_POWER, .flags = HL_QUANTITY_RESULT, NO_DEFAULT, NO_RANGE, LIMITS (-1e12, 1e12),
    .help = N_("Fuel heat on the lower heating value that does not reach the working fluid: mostly flue gas.") },
};

const HlKind hl_kind_boiler = {
  .id = "boiler", .letter = "B", .name = N_("Fired boiler"), .shelf_name = N_("boiler"), .shelf_group = N_("Heat"),
  .help = N_("Burns fuel to make steam, with up to two reheats; counts fuel, efficiency and losses."),
  .half_width = 3, .half_height = 3,
  .ports = ROWS (heat_source_ports), .options = ROWS (options), .quantities = ROWS (quantities),
};
