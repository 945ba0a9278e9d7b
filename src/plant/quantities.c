/* Quantities of a stream and of the plant as a whole, and what all quantities have in common.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "plant/kinds/kinds.h"

static const HlQuantityKind stream_quantities[] = {
  { .key = "m", .sign = "m", .name = N_("Mass flow"), .group = N_("State"), .dimension = HL_DIMENSION_MASS_FLOW,
    .flags = HL_QUANTITY_USUAL | HL_QUANTITY_RESULT, DEFAULT (10.0, N_("an example size, no source")), NO_RANGE, LIMITS_FLOW,
    .yield_rank = 20, .help = N_("Mass that flows through in a second.") },
  { .key = "p", .sign = "p", .name = N_("Pressure"), .group = N_("State"), .dimension = HL_DIMENSION_PRESSURE,
    .flags = HL_QUANTITY_USUAL | HL_QUANTITY_RESULT, NO_DEFAULT, NO_RANGE, LIMITS_PRESSURE,
    .yield_rank = 20, .help = N_("Absolute pressure.") },
  { .key = "T", .sign = "T", .name = N_("Temperature"), .group = N_("State"), .dimension = HL_DIMENSION_TEMPERATURE,
    .flags = HL_QUANTITY_USUAL | HL_QUANTITY_RESULT, NO_DEFAULT, NO_RANGE, LIMITS_TEMPERATURE,
    .yield_rank = 20, .help = N_("Temperature; in wet steam it says no more than the pressure does.") },
  { .key = "h", .sign = "h", .name = N_("Enthalpy"), .group = N_("State"), .dimension = HL_DIMENSION_ENTHALPY,
    .flags = HL_QUANTITY_RESULT, NO_DEFAULT, NO_RANGE, LIMITS (-1e7, 1e7),
    .yield_rank = 20, .help = N_("Specific enthalpy, zero where the formulation says: for water the liquid at the triple point.") },
  { .key = "s", .sign = "s", .name = N_("Entropy"), .group = N_("State"), .dimension = HL_DIMENSION_ENTROPY,
    .flags = HL_QUANTITY_RESULT, NO_DEFAULT, NO_RANGE, LIMITS (-1e5, 1e5),
    .yield_rank = 20, .help = N_("Specific entropy, zero where the formulation says: for water the liquid at the triple point.") },
  { .key = "x", .sign = "x", .name = N_("Quality"), .group = N_("State"), .dimension = HL_DIMENSION_RATIO,
    .flags = HL_QUANTITY_RESULT, NO_DEFAULT, NO_RANGE, LIMITS_FRACTION,
    .yield_rank = 20, .help = N_("Vapour mass fraction; there is none outside the wet region.") },
  { .key = "v", .sign = "v", .name = N_("Specific volume"), .group = N_("State"), .dimension = HL_DIMENSION_VOLUME,
    .flags = HL_QUANTITY_RESULT, NO_DEFAULT, NO_RANGE, LIMITS (0.0, 1e6),
    .yield_rank = 20, .help = N_("Volume of a kilogram.") },
  { .key = "e", .sign = "e", .name = N_("Exergy"), .group = N_("State"), .dimension = HL_DIMENSION_ENTHALPY,
    .flags = HL_QUANTITY_RESULT | HL_QUANTITY_DERIVED, NO_DEFAULT, NO_RANGE, LIMITS (-1e8, 1e8),
    .yield_rank = 20, .help = N_("Specific flow exergy, physical: the work that a kilogram could give on its way to the site's dead state.") },
};

#define RESULT_POWER(the_key, the_sign, the_name, the_group, the_help) \
  { .key = the_key, .sign = the_sign, .name = the_name, .group = the_group, .dimension = HL_DIMENSION_POWER, \
    .flags = HL_QUANTITY_RESULT, NO_DEFAULT, NO_RANGE, LIMITS_POWER, .yield_rank = 20, .help = the_help }
#define RESULT_EFFICIENCY(the_key, the_name, most, the_help) \
  { .key = the_key, .sign = "η", .name = the_name, .group = N_("Efficiency"), .dimension = HL_DIMENSION_RATIO, \
    .flags = HL_QUANTITY_RESULT | HL_QUANTITY_PERCENT, NO_DEFAULT, NO_RANGE, LIMITS (0.0, most), .yield_rank = 20, .help = the_help }

#define SECOND_LAW(the_key, the_sign, the_name, the_help) \
  { .key = the_key, .sign = the_sign, .name = the_name, .group = N_("Second law"), .dimension = HL_DIMENSION_POWER, \
    .flags = HL_QUANTITY_RESULT | HL_QUANTITY_DERIVED, NO_DEFAULT, NO_RANGE, LIMITS (-1e12, 1e12), .yield_rank = 20, .help = the_help }
#define SECOND_LAW_EFFICIENCY(the_help) \
  { .key = "exergy_efficiency", .sign = "ε", .name = N_("Exergy efficiency"), .group = N_("Second law"), \
    .dimension = HL_DIMENSION_RATIO, .flags = HL_QUANTITY_RESULT | HL_QUANTITY_PERCENT | HL_QUANTITY_DERIVED, NO_DEFAULT, NO_RANGE, \
    LIMITS (-1e6, 1e6), .yield_rank = 20, .help = the_help }

static const HlQuantityKind common_quantities[] = {
  SECOND_LAW ("exergy_fuel", "E_F", N_("Exergy spent"), N_("What the product of this component costs, in exergy: its fuel.")),
  SECOND_LAW ("exergy_product", "E_P", N_("Exergy made"), N_("What this component is there for, in exergy: its product.")),
  SECOND_LAW ("exergy_loss", "E_L", N_("Exergy lost"), N_("Exergy that leaves this component for the surroundings unused.")),
  SECOND_LAW ("exergy_destruction", "E_D", N_("Exergy destroyed"), N_("Dead state temperature times the entropy that this component produces.")),
  SECOND_LAW_EFFICIENCY (N_("Exergy made over exergy spent.")),
};

static const HlQuantityKind plant_quantities[] = {
  { .key = "net_power", .sign = "P_net", .name = N_("Net power"), .group = N_("Power"), .dimension = HL_DIMENSION_POWER,
    .flags = HL_QUANTITY_USUAL | HL_QUANTITY_ASSUMED | HL_QUANTITY_RESULT, DEFAULT (10e6, N_("an example size, no source")),
    NO_RANGE, LIMITS (-1e12, 1e12), .yield_rank = 5, .help = N_("Electrical power less own consumption.") },
  RESULT_POWER ("gross_power", "P_gross", N_("Gross power"), N_("Power"),
                N_("Electrical power at the terminals of all generators.")),
  RESULT_POWER ("own_consumption", "P_own", N_("Own consumption"), N_("Power"),
                N_("Electrical power of motors, of the fans of air-cooled condensers, and of other consumers.")),
  RESULT_POWER ("other_consumption", "P_other", N_("Other consumption"), N_("Power"),
                N_("Own consumption of what is not drawn: fans, fuel handling, lighting, cooling pumps.")),
  { .key = "other_consumption_fraction", .sign = "P/P", .name = N_("Other consumption of gross"), .group = N_("Power"),
    .dimension = HL_DIMENSION_RATIO, .flags = HL_QUANTITY_ASSUMED | HL_QUANTITY_PERCENT,
    /* xgettext:no-c-format */
    DEFAULT (0.0, N_("simplification, no source: nothing else; with feed pumps fossil plants need 5-15 % of gross")),
    RANGE (0.0, 0.15), LIMITS_FRACTION, .yield_rank = 70, .help = N_("Other consumption over gross power.") },
  RESULT_POWER ("heat_input", "Q_in", N_("Heat input"), N_("Heat"), N_("Heat given to the working fluid.")),
  RESULT_POWER ("fuel_heat", "Q_fuel", N_("Fuel heat (LHV)"), N_("Heat"), N_("Fuel burnt times its lower heating value.")),
  { .key = "fuel_flow", .sign = "m_fuel", .name = N_("Fuel flow"), .group = N_("Heat"), .dimension = HL_DIMENSION_MASS_FLOW,
    .flags = HL_QUANTITY_RESULT, NO_DEFAULT, NO_RANGE, LIMITS_FLOW, .yield_rank = 20, .help = N_("Fuel burnt in a second, all boilers.") },
  { .key = "co2_flow", .sign = "m_CO2", .name = N_("CO2 flow"), .group = N_("Emission"), .dimension = HL_DIMENSION_MASS_FLOW,
    .flags = HL_QUANTITY_RESULT, NO_DEFAULT, NO_RANGE, LIMITS_FLOW, .yield_rank = 20,
    .help = N_("CO2 from the fossil carbon of all fuels that are named.") },
  { .key = "biogenic_co2_flow", .sign = "m_CO2", .name = N_("Biogenic CO2 flow"), .group = N_("Emission"), .dimension = HL_DIMENSION_MASS_FLOW,
    .flags = HL_QUANTITY_RESULT, NO_DEFAULT, NO_RANGE, LIMITS_FLOW, .yield_rank = 20,
    .help = N_("CO2 from carbon that grew lately, all fuels that are named; counted apart.") },
  { .key = "specific_co2", .sign = "m/P", .name = N_("CO2 per net power"), .group = N_("Emission"), .dimension = HL_DIMENSION_EMISSION,
    .flags = HL_QUANTITY_RESULT, NO_DEFAULT, NO_RANGE, LIMITS (HL_FROM_ZERO, 1.0), .yield_rank = 20,
    .help = N_("CO2 from fossil carbon over net electrical power; heat delivered takes no part of it.") },
  RESULT_POWER ("heat_delivered", "Q_out", N_("Heat delivered"), N_("Heat"), N_("Heat to process steam users and other heat customers.")),
  RESULT_POWER ("heat_rejected", "Q_rej", N_("Heat rejected"), N_("Heat"), N_("Heat given to the surroundings by condensers.")),
  RESULT_EFFICIENCY ("cycle_efficiency", N_("Cycle efficiency"), 1.0,
                     N_("Shaft power of the turbines less that of the pumps, over heat input.")),
  RESULT_EFFICIENCY ("gross_efficiency", N_("Gross efficiency (LHV)"), 1.2,
                     N_("Gross power over fuel heat on the lower heating value; without fuel over heat input.")),
  RESULT_EFFICIENCY ("net_efficiency_lhv", N_("Net efficiency (LHV)"), 1.2,
                     N_("Net power over fuel heat on the lower heating value; without fuel over heat input.")),
  RESULT_EFFICIENCY ("net_efficiency_hhv", N_("Net efficiency (HHV)"), 1.2,
                     N_("Net power over fuel heat on the higher heating value.")),
  RESULT_EFFICIENCY ("utilisation", N_("Utilisation"), 2.0,
                     N_("Net power plus heat delivered, over fuel heat on the lower heating value; without fuel over heat input.")),
  RESULT_POWER ("power_input", "P_in", N_("Power input"), N_("Power"),
                N_("Electrical power taken by the motors of compressors, pumps and fans, of a plant without generator.")),
  { .key = "cop", .sign = "COP", .name = N_("Coefficient of performance, heating"), .group = N_("Efficiency"), .dimension = HL_DIMENSION_RATIO,
    .flags = HL_QUANTITY_RESULT, NO_DEFAULT, RANGE (1.5, 8.0), LIMITS (0.0, 1e3), .yield_rank = 20,
    .help = N_("Of a heat pump: heat delivered over power input, both of the whole plant.") },
  { .key = "cop_cooling", .sign = "COP_c", .name = N_("Coefficient of performance, cooling"), .group = N_("Efficiency"), .dimension = HL_DIMENSION_RATIO,
    .flags = HL_QUANTITY_RESULT, NO_DEFAULT, RANGE (1.0, 8.0), LIMITS (0.0, 1e3), .yield_rank = 20,
    .help = N_("Of a refrigerating machine: heat taken up from what is cooled over power input, both of the whole plant.") },
  { .key = "heat_rate", .sign = "HR", .name = N_("Heat rate"), .group = N_("Efficiency"), .dimension = HL_DIMENSION_HEAT_RATE,
    .flags = HL_QUANTITY_RESULT, NO_DEFAULT, NO_RANGE, LIMITS (0.0, 1e6), .yield_rank = 20,
    .help = N_("Gross turbine heat rate: heat input over gross power.") },
  { .key = "steam_rate", .sign = "SR", .name = N_("Steam rate"), .group = N_("Efficiency"), .dimension = HL_DIMENSION_STEAM_RATE,
    .flags = HL_QUANTITY_RESULT, NO_DEFAULT, NO_RANGE, LIMITS (0.0, 1.0), .yield_rank = 20,
    .help = N_("Live steam over gross power.") },
  { .key = "back_work_ratio", .sign = "P/P", .name = N_("Back work ratio"), .group = N_("Efficiency"), .dimension = HL_DIMENSION_RATIO,
    .flags = HL_QUANTITY_RESULT | HL_QUANTITY_PERCENT, NO_DEFAULT, NO_RANGE, LIMITS_FRACTION, .yield_rank = 20,
    .help = N_("Shaft power of the pumps over that of the turbines.") },
  { .key = "carnot_efficiency", .sign = "η", .name = N_("Carnot efficiency"), .group = N_("Efficiency"),
    .dimension = HL_DIMENSION_RATIO, .flags = HL_QUANTITY_RESULT | HL_QUANTITY_PERCENT | HL_QUANTITY_DERIVED, NO_DEFAULT, NO_RANGE,
    LIMITS (0.0, 1.0), .yield_rank = 20,
    .help = N_("1 - lowest over highest temperature of the working fluid: no cycle between them does better.") },
  { .key = "exhaust_moisture", .sign = "y", .name = N_("Exhaust moisture"), .group = N_("Limits"), .dimension = HL_DIMENSION_RATIO,
    .flags = HL_QUANTITY_RESULT | HL_QUANTITY_PERCENT, NO_DEFAULT, RANGE (0.0, 0.12), LIMITS_FRACTION, .yield_rank = 20,
    .help = N_("Liquid mass fraction at the wettest turbine exhaust.") },
  SECOND_LAW ("exergy_input", "E_in", N_("Exergy input"),
              N_("Exergy of all that comes in: fuel, heat at the temperature at which it passes, streams, electricity.")),
  SECOND_LAW ("exergy_product", "E_P", N_("Exergy made"), N_("Net power, and the exergy of the heat delivered.")),
  SECOND_LAW ("exergy_loss", "E_L", N_("Exergy lost"),
              N_("Exergy that leaves unused: with cooling water, heat losses, water lost, streams that leave, consumers not drawn.")),
  SECOND_LAW ("exergy_destruction", "E_D", N_("Exergy destroyed"), N_("Dead state temperature times the entropy that all components produce.")),
  SECOND_LAW_EFFICIENCY (N_("Exergy made over exergy input.")),
};

static const HlQuantityKind *
lookup (const HlQuantityKind *kinds, guint n, const char *key)
{
  for (guint i = 0; i < n; i++)
    if (g_str_equal (kinds[i].key, key))
      return &kinds[i];
  return NULL;
}

const HlQuantityKind *
hl_common_quantities (guint *n)
{
  *n = G_N_ELEMENTS (common_quantities);
  return common_quantities;
}

const HlQuantityKind *
hl_plant_quantities (guint *n)
{
  *n = G_N_ELEMENTS (plant_quantities);
  return plant_quantities;
}

const HlQuantityKind *
hl_stream_quantities (guint *n)
{
  *n = G_N_ELEMENTS (stream_quantities);
  return stream_quantities;
}

const HlQuantityKind *
hl_stream_quantity_lookup (const char *key)
{
  g_return_val_if_fail (key != NULL, NULL);
  return lookup (stream_quantities, G_N_ELEMENTS (stream_quantities), key);
}

const HlQuantityKind *
hl_plant_quantity_lookup (const char *key)
{
  g_return_val_if_fail (key != NULL, NULL);
  return lookup (plant_quantities, G_N_ELEMENTS (plant_quantities), key);
}

double
hl_quantity_default (const HlQuantityKind *quantity, int number)
{
  g_return_val_if_fail (quantity != NULL, NAN);
  if (quantity->numbered_defaults != NULL && number >= 1)
    return quantity->numbered_defaults[number - 1];
  return quantity->default_value;
}

char *
hl_quantity_format (const HlQuantityKind *quantity, double si, HlUnitSet set)
{
  g_return_val_if_fail (quantity != NULL, NULL);
  if ((quantity->flags & HL_QUANTITY_PERCENT) && isfinite (si))
    return g_strdup_printf ("%.2f %%", fabs (si) < 0.5e-4 ? 0.0 : 100.0 * si);
  return hl_units_format (si, quantity->dimension, set);
}

char *
hl_quantity_format_exact (const HlQuantityKind *quantity, double si, HlUnitSet set)
{
  g_return_val_if_fail (quantity != NULL, NULL);
  if ((quantity->flags & HL_QUANTITY_PERCENT) && isfinite (si))
    return hl_units_format_percent (si);
  return hl_units_format_exact (si, quantity->dimension, set);
}
