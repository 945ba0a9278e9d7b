/* Fired boiler: a heat input with blowdown, fuel, efficiency or losses, and what it emits.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "plant/kinds/fuels.h"
#include "plant/kinds/heat-source.h"

enum { EFFICIENCY_GIVEN, EFFICIENCY_BY_LOSSES };
static const char *const efficiency_words[] = { "given", "losses", NULL };
static const char *const efficiency_names[] = { N_("is a value of its own"), N_("follows from the losses"), NULL };

enum { BLOWDOWN_NONE, BLOWDOWN_DRUM };
static const char *const blowdown_words[] = { "none", "drum", NULL };
static const char *const blowdown_names[] = { N_("none"), N_("from the drum"), NULL };

static const HlOptionKind options[] = {
  REHEAT_OPTION,
  { .key = "fuel", .name = N_("Fuel"), .least = 0, .most = N_FUELS - 1, .usual = FUEL_NOT_NAMED, .choices = fuel_words, .choice_names = fuel_names },
  { .key = "efficiency_by", .name = N_("Efficiency"), .least = 0, .most = 1, .usual = EFFICIENCY_GIVEN,
    .choices = efficiency_words, .choice_names = efficiency_names },
  { .key = "blowdown", .name = N_("Blowdown"), .least = 0, .most = 1, .usual = BLOWDOWN_NONE, .choices = blowdown_words, .choice_names = blowdown_names },
};

#define WITH_LOSSES   .when_option = "efficiency_by", .when_choice = EFFICIENCY_BY_LOSSES
#define WITH_BLOWDOWN .when_option = "blowdown", .when_choice = BLOWDOWN_DRUM

static const HlPortKind ports[] = {
  HEAT_SOURCE_PORTS,
  { .key = "blowdown", .name = N_("blowdown outlet"), .direction = HL_PORT_OUT, .side = HL_SIDE_LEFT, .x = -3, .y = 2, WITH_BLOWDOWN },
};

#define LOSS_RESULT(the_key, the_name, the_help) \
  { .key = the_key, .sign = "Q", .name = the_name, .group = N_("Losses by kind"), .dimension = HL_DIMENSION_POWER, .flags = HL_QUANTITY_RESULT, \
    NO_DEFAULT, NO_RANGE, LIMITS (-1e12, 1e12), .help = the_help, WITH_LOSSES }

static const HlQuantityKind quantities[] = {
  STEAM_ROWS,
  { .key = "pressure_loss", .sign = "Δp/p", .name = N_("Pressure loss"), .group = N_("Losses"),
    .dimension = HL_DIMENSION_RATIO, .flags = HL_QUANTITY_ASSUMED | HL_QUANTITY_PERCENT,
    DEFAULT (0.08, N_("common practice, no source: drum to stop valve")),
    RANGE (0.03, 0.15), LIMITS_LOSS, .yield_rank = 60,
    .help = N_("Pressure lost from feed inlet to steam outlet as a part of the feed pressure.") },
  REHEAT_LOSS_ROW,
  { .key = "blowdown_fraction", .sign = "m/m", .name = N_("Blowdown of feed"), .group = N_("Blowdown"),
    .dimension = HL_DIMENSION_RATIO, .flags = HL_QUANTITY_ASSUMED | HL_QUANTITY_PERCENT,
    DEFAULT (0.01, N_("common practice, no source: 0.5-3 %, industrial boilers up to 8 %")),
    RANGE (0.005, 0.08), LIMITS_FRACTION, .yield_rank = 75,
    .help = N_("Water let off from the drum, to keep its salts down, over feedwater."), WITH_BLOWDOWN },
  { .key = "economiser_pressure_loss", .sign = "Δp/p", .name = N_("Pressure loss up to the drum"), .group = N_("Blowdown"),
    .dimension = HL_DIMENSION_RATIO, .flags = HL_QUANTITY_ASSUMED | HL_QUANTITY_PERCENT,
    DEFAULT (0.025, N_("common practice, no source: 1-5 bar in the economiser, 2 of 80 bar")),
    RANGE (0.0, 0.06), LIMITS_LOSS, .yield_rank = 62,
    .help = N_("Pressure lost from feed inlet to drum as a part of the feed pressure: the drum's pressure is that of the blowdown."), WITH_BLOWDOWN },
  HEAT_ROWS,
  { .key = "efficiency", .sign = "η", .name = N_("Boiler efficiency (LHV)"), .group = N_("Fuel"),
    .dimension = HL_DIMENSION_RATIO, .flags = HL_QUANTITY_ASSUMED | HL_QUANTITY_RESULT,
    DEFAULT (0.90, BY_KIND),
    RANGE (0.79, 0.97), LIMITS (0.0, 1.2), .yield_rank = 70, BY_FUEL (fuel_efficiency),
    .found_option = "efficiency_by", .found_choice = EFFICIENCY_BY_LOSSES,
    .help = N_("Heat to the working fluid, blowdown included, over fuel heat on the lower heating value.") },
  { .key = "fuel_heat", .sign = "Q", .name = N_("Fuel heat (LHV)"), .group = N_("Fuel"),
    .dimension = HL_DIMENSION_POWER, .flags = HL_QUANTITY_RESULT, NO_DEFAULT, NO_RANGE, LIMITS_POWER,
    .help = N_("Fuel flow times lower heating value.") },
  { .key = "fuel_heat_hhv", .sign = "Q_H", .name = N_("Fuel heat (HHV)"), .group = N_("Fuel"),
    .dimension = HL_DIMENSION_POWER, .flags = HL_QUANTITY_RESULT, NO_DEFAULT, NO_RANGE, LIMITS_POWER,
    .help = N_("Fuel flow times higher heating value.") },
  { .key = "fuel_flow", .sign = "m", .name = N_("Fuel flow"), .group = N_("Fuel"),
    .dimension = HL_DIMENSION_MASS_FLOW, .flags = HL_QUANTITY_RESULT, NO_DEFAULT, NO_RANGE, LIMITS_FLOW,
    .help = N_("Mass of fuel burnt in a second.") },
  { .key = "fuel_lhv", .sign = "LHV", .name = N_("Lower heating value"), .group = N_("Fuel"),
    .dimension = HL_DIMENSION_ENTHALPY, .flags = HL_QUANTITY_ASSUMED,
    DEFAULT (48e6, N_("natural gas: IPCC 2006 Guidelines, vol. 2, table 1.2, quoted from a secondary text")),
    RANGE (5e6, 55e6), LIMITS (0.0, 1.5e8), .yield_rank = 95, BY_FUEL (fuel_lhv),
    .help = N_("Lower heating value of the fuel as fired.") },
  { .key = "fuel_hhv_ratio", .sign = "HHV/LHV", .name = N_("Higher over lower heating value"), .group = N_("Fuel"),
    .dimension = HL_DIMENSION_RATIO, .flags = HL_QUANTITY_ASSUMED,
    DEFAULT (1.11, SECONDARY),
    RANGE (1.0, 1.6), LIMITS (0.999, 5.0), .yield_rank = 96, BY_FUEL (fuel_hhv_ratio),
    .help = N_("Higher heating value of the fuel divided by the lower one; only efficiencies on the higher heating value need it.") },
  { .key = "fuel_exergy_ratio", .sign = "φ", .name = N_("Fuel exergy over heating value"), .group = N_("Fuel"),
    .dimension = HL_DIMENSION_RATIO, .flags = HL_QUANTITY_ASSUMED,
    DEFAULT (1.04, EXERGY_RATIOS), RANGE (1.0, 1.3), LIMITS (0.5, 2.0), .yield_rank = 99, BY_FUEL (fuel_exergy),
    .help = N_("Chemical exergy of the fuel divided by its lower heating value; only results of the second law need it.") },
  { .key = "flue_loss", .sign = "Q", .name = N_("Boiler losses"), .group = N_("Fuel"),
    .dimension = HL_DIMENSION_POWER, .flags = HL_QUANTITY_RESULT, NO_DEFAULT, NO_RANGE, LIMITS (-1e12, 1e12),
    .help = N_("Fuel heat on the lower heating value that does not reach the working fluid: mostly flue gas.") },
  { .key = "flue_gas_T", .sign = "T", .name = N_("Flue gas temperature"), .group = N_("Losses by kind"),
    .dimension = HL_DIMENSION_TEMPERATURE, .flags = HL_QUANTITY_ASSUMED | HL_QUANTITY_USUAL,
    DEFAULT (413.15, N_("common practice, no source: clean fuel down to 90 °C, fuel with sulphur 130-150 °C and more")),
    RANGE (353.15, 493.15), LIMITS_TEMPERATURE, .yield_rank = 10,
    .help = N_("Temperature of the flue gas behind the last heating surface; the loss counts from the air of the site."), WITH_LOSSES },
  { .key = "excess_air", .sign = "e", .name = N_("Excess air"), .group = N_("Losses by kind"),
    .dimension = HL_DIMENSION_RATIO, .flags = HL_QUANTITY_ASSUMED | HL_QUANTITY_PERCENT,
    DEFAULT (0.20, COMMON_PRACTICE), RANGE (0.03, 1.0), LIMITS (HL_FROM_ZERO, 20.0), .yield_rank = 12, BY_FUEL (fuel_excess_air),
    .help = N_("Air beyond what burning needs, over what it needs."), WITH_LOSSES },
  { .key = "flue_gas_oxygen", .sign = "O2", .name = N_("Oxygen in dry flue gas"), .group = N_("Losses by kind"),
    .dimension = HL_DIMENSION_RATIO, .flags = HL_QUANTITY_RESULT | HL_QUANTITY_PERCENT,
    NO_DEFAULT, RANGE (0.005, 0.12), LIMITS (HL_FROM_ZERO, 0.209), .yield_rank = 11,
    .help = N_("Volume fraction of oxygen in the dry flue gas; another way to say the excess air."), WITH_LOSSES },
  { .key = "dry_gas_constant", .sign = "A", .name = N_("Siegert constant A"), .group = N_("Losses by kind"),
    .dimension = HL_DIMENSION_RATIO, .flags = HL_QUANTITY_ASSUMED,
    DEFAULT (0.70, SIEGERT_OURS), RANGE (0.5, 0.9), LIMITS (0.0, 5.0), .yield_rank = 90, BY_FUEL (fuel_dry_gas),
    .help = N_("Constant of the fuel for its dry flue gas: per cent lost = (T gas − T air) × (A ÷ (21 − O2 in per cent) + B)."), WITH_LOSSES },
  { .key = "wet_gas_constant", .sign = "B", .name = N_("Siegert constant B"), .group = N_("Losses by kind"),
    .dimension = HL_DIMENSION_RATIO, .flags = HL_QUANTITY_ASSUMED,
    DEFAULT (0.005, SIEGERT_OURS), RANGE (0.0, 0.03), LIMITS (HL_FROM_ZERO, 1.0), .yield_rank = 91, BY_FUEL (fuel_wet_gas),
    .help = N_("Constant of the fuel for the water vapour of its flue gas."), WITH_LOSSES },
  { .key = "unburned_fraction", .sign = "Q/Q", .name = N_("Unburned of fuel heat"), .group = N_("Losses by kind"),
    .dimension = HL_DIMENSION_RATIO, .flags = HL_QUANTITY_ASSUMED | HL_QUANTITY_PERCENT,
    DEFAULT (0.0, N_("common practice, no source: gas and oil burn up, solid fuels leave half to three per cent, or more, in ash and as CO")),
    RANGE (0.0, 0.05), LIMITS_FRACTION, .yield_rank = 72, BY_FUEL (fuel_unburned),
    .help = N_("Fuel heat that is lost in ash and as unburned gas, over fuel heat."), WITH_LOSSES },
  { .key = "radiation_coefficient", .sign = "C", .name = N_("Radiation coefficient"), .group = N_("Losses by kind"),
    .dimension = HL_DIMENSION_RATIO, .flags = HL_QUANTITY_ASSUMED,
    DEFAULT (0.0220, EN_RADIATION), RANGE (0.005, 0.05), LIMITS (HL_FROM_ZERO, 1.0), .yield_rank = 73, BY_FUEL (fuel_radiation),
    .help = N_("C of the loss by radiation and convection of the walls, C × Q^0.7 with both in MW, Q the heat to the working fluid."), WITH_LOSSES },
  LOSS_RESULT ("stack_loss", N_("Flue gas loss"), N_("Sensible heat of the flue gas, by Siegert's formula.")),
  LOSS_RESULT ("unburned_loss", N_("Loss by unburned fuel"), N_("Fuel heat in ash and unburned gas.")),
  LOSS_RESULT ("radiation_loss", N_("Loss by radiation"), N_("Heat lost by the walls, by the formula of EN 12952-15, from memory.")),
  { .key = "co2_factor", .sign = "f", .name = N_("CO2 of fuel heat"), .group = N_("Emission"),
    .dimension = HL_DIMENSION_EMISSION, .flags = HL_QUANTITY_ASSUMED,
    DEFAULT (56.1e-9, IPCC), RANGE (0.0, 120e-9), LIMITS (HL_FROM_ZERO, 1e-6), .yield_rank = 97, BY_FUEL (fuel_co2),
    .help = N_("CO2 from fossil carbon over fuel heat on the lower heating value."), WITH_FUEL },
  { .key = "biogenic_co2_factor", .sign = "f", .name = N_("Biogenic CO2 of fuel heat"), .group = N_("Emission"),
    .dimension = HL_DIMENSION_EMISSION, .flags = HL_QUANTITY_ASSUMED,
    DEFAULT (0.0, NOT_BIOGENIC), RANGE (0.0, 120e-9), LIMITS (HL_FROM_ZERO, 1e-6), .yield_rank = 98, BY_FUEL (fuel_biogenic_co2),
    .help = N_("CO2 from carbon that grew lately over fuel heat on the lower heating value; counted apart."), WITH_FUEL },
  { .key = "co2_flow", .sign = "m", .name = N_("CO2 flow"), .group = N_("Emission"),
    .dimension = HL_DIMENSION_MASS_FLOW, .flags = HL_QUANTITY_RESULT, NO_DEFAULT, NO_RANGE, LIMITS_FLOW,
    .help = N_("CO2 from fossil carbon that leaves with the flue gas."), WITH_FUEL },
  { .key = "biogenic_co2_flow", .sign = "m", .name = N_("Biogenic CO2 flow"), .group = N_("Emission"),
    .dimension = HL_DIMENSION_MASS_FLOW, .flags = HL_QUANTITY_RESULT, NO_DEFAULT, NO_RANGE, LIMITS_FLOW,
    .help = N_("CO2 from carbon that grew lately; counted apart."), WITH_FUEL },
};

const HlKind hl_kind_boiler = {
  .id = "boiler", .letter = "B", .name = N_("Fired boiler"), .shelf_name = N_("boiler"), .shelf_group = N_("Heat"),
  .help = N_("Burns fuel to make steam, with up to two reheats and blowdown; counts fuel, efficiency, losses and CO2."),
  .half_width = 3, .half_height = 3,
  .ports = ROWS (ports), .options = ROWS (options), .quantities = ROWS (quantities),
};
