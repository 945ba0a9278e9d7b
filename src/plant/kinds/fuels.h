/* Named fuels: what a boiler assumes of each, with its source.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#pragma once
#include "plant/kinds/kinds.h"

enum { FUEL_NOT_NAMED, FUEL_NATURAL_GAS, FUEL_DIESEL_OIL, FUEL_RESIDUAL_OIL, FUEL_ANTHRACITE, FUEL_BITUMINOUS_COAL,
       FUEL_SUB_BITUMINOUS_COAL, FUEL_LIGNITE, FUEL_WOOD, FUEL_WASTE, N_FUELS };

static const char *const fuel_words[] = {
  "not named", "natural gas", "diesel oil", "residual oil", "anthracite", "bituminous coal", "sub-bituminous coal", "lignite",
  "wood", "municipal waste", NULL
};
static const char *const fuel_names[] = {
  N_("not named"), N_("natural gas"), N_("diesel oil"), N_("residual fuel oil"), N_("anthracite"), N_("bituminous coal"),
  N_("sub-bituminous coal"), N_("lignite"), N_("wood"), N_("municipal waste"), NULL
};

#define BY_FUEL(defaults) .default_option = "fuel", .choice_defaults = (defaults)
#define WITH_FUEL .when_option = "fuel", .when_choice = HL_UNLESS (FUEL_NOT_NAMED)

#define IPCC            N_("IPCC 2006 Guidelines, vol. 2, tables 1.2 and 1.4, quoted from a secondary text")
#define IPCC_MEMORY     N_("IPCC 2006 Guidelines, vol. 2, tables 1.2 and 1.4, from memory")
#define IPCC_WASTE      N_("half of the heat from the fossil, half from the biogenic part of municipal waste: IPCC 2006 Guidelines, vol. 2, from memory; the halves are an example, no source")
#define NOT_FOSSIL      N_("IPCC 2006 Guidelines, vol. 2: the carbon of wood grew lately, and is counted apart")
#define NOT_BIOGENIC    N_("IPCC 2006 Guidelines, vol. 2: all of its carbon is fossil")
#define SECONDARY       N_("natural gas 1.11, diesel oil 1.07, from a secondary text")
#define NET_BELOW_GROSS N_("IPCC 2006 Guidelines, vol. 2, from memory: the net value of coal and oil lies about a twentieth below the gross one")
#define BY_ANALYSIS     N_("calculated for an example of an analysis: HHV − LHV = 2.442 (8.94 H + w) MJ/kg, H hydrogen, w water by mass")
#define BY_KIND         N_("common practice, no source: gas 0.93, oil 0.91, hard coal 0.90, lignite and wood 0.87, waste 0.83")
#define SIEGERT         N_("Siegert's formula with the constants of the German 1. BImSchV, from memory")
#define SIEGERT_OURS    N_("calculated for an example of an analysis: dry flue gas of 1.33 kJ/(m3 K), its water vapour of 1.5 kJ/(m3 K)")
#define EN_RADIATION    N_("EN 12952-15, from memory, to be checked: 0.0113 oil and gas, 0.0220 hard coal, 0.0315 lignite and fluidised bed")

#define EXERGY_RATIOS   N_("natural gas 1.04, fuel oil 1.06, hard coal 1.06-1.10, lignite 1.17, wood 1.15-1.30: from memory of Kotas 1985 and Szargut")
#define EXERGY_AS_WOOD  N_("no source: taken as that of wood")

static const HlChoiceDefault fuel_lhv[N_FUELS] = {
  [FUEL_NATURAL_GAS] = { 48.0e6, IPCC }, [FUEL_DIESEL_OIL] = { 43.0e6, IPCC_MEMORY }, [FUEL_RESIDUAL_OIL] = { 40.4e6, IPCC },
  [FUEL_ANTHRACITE] = { 26.7e6, IPCC_MEMORY }, [FUEL_BITUMINOUS_COAL] = { 25.8e6, IPCC_MEMORY },
  [FUEL_SUB_BITUMINOUS_COAL] = { 18.9e6, IPCC_MEMORY }, [FUEL_LIGNITE] = { 11.9e6, IPCC }, [FUEL_WOOD] = { 15.6e6, IPCC },
  /* 2 / (1/10.0 + 1/11.6) MJ/kg */
  [FUEL_WASTE] = { 10.74e6, IPCC_WASTE },
};
static const HlChoiceDefault fuel_hhv_ratio[N_FUELS] = {
  [FUEL_NATURAL_GAS] = { 1.11, SECONDARY }, [FUEL_DIESEL_OIL] = { 1.07, SECONDARY }, [FUEL_RESIDUAL_OIL] = { 1.053, NET_BELOW_GROSS },
  [FUEL_ANTHRACITE] = { 1.053, NET_BELOW_GROSS }, [FUEL_BITUMINOUS_COAL] = { 1.053, NET_BELOW_GROSS },
  /* H, w: 0.035, 0.25; 0.027, 0.42; 0.052, 0.13; 0.040, 0.30 */
  [FUEL_SUB_BITUMINOUS_COAL] = { 1.073, BY_ANALYSIS }, [FUEL_LIGNITE] = { 1.136, BY_ANALYSIS }, [FUEL_WOOD] = { 1.093, BY_ANALYSIS },
  [FUEL_WASTE] = { 1.150, BY_ANALYSIS },
};
static const HlChoiceDefault fuel_co2[N_FUELS] = {
  [FUEL_NATURAL_GAS] = { 56.1e-9, IPCC }, [FUEL_DIESEL_OIL] = { 74.1e-9, IPCC }, [FUEL_RESIDUAL_OIL] = { 77.4e-9, IPCC },
  [FUEL_ANTHRACITE] = { 98.3e-9, IPCC }, [FUEL_BITUMINOUS_COAL] = { 94.6e-9, IPCC }, [FUEL_SUB_BITUMINOUS_COAL] = { 96.1e-9, IPCC_MEMORY },
  [FUEL_LIGNITE] = { 101.0e-9, IPCC }, [FUEL_WOOD] = { 0.0, NOT_FOSSIL }, [FUEL_WASTE] = { 45.85e-9, IPCC_WASTE },
};
static const HlChoiceDefault fuel_biogenic_co2[N_FUELS] = {
  [FUEL_NATURAL_GAS] = { 0.0, NOT_BIOGENIC }, [FUEL_DIESEL_OIL] = { 0.0, NOT_BIOGENIC }, [FUEL_RESIDUAL_OIL] = { 0.0, NOT_BIOGENIC },
  [FUEL_ANTHRACITE] = { 0.0, NOT_BIOGENIC }, [FUEL_BITUMINOUS_COAL] = { 0.0, NOT_BIOGENIC },
  [FUEL_SUB_BITUMINOUS_COAL] = { 0.0, NOT_BIOGENIC }, [FUEL_LIGNITE] = { 0.0, NOT_BIOGENIC }, [FUEL_WOOD] = { 112.0e-9, IPCC },
  [FUEL_WASTE] = { 50.0e-9, IPCC_WASTE },
};
static const HlChoiceDefault fuel_efficiency[N_FUELS] = {
  [FUEL_NATURAL_GAS] = { 0.93, BY_KIND }, [FUEL_DIESEL_OIL] = { 0.91, BY_KIND }, [FUEL_RESIDUAL_OIL] = { 0.91, BY_KIND },
  [FUEL_ANTHRACITE] = { 0.90, BY_KIND }, [FUEL_BITUMINOUS_COAL] = { 0.90, BY_KIND }, [FUEL_SUB_BITUMINOUS_COAL] = { 0.90, BY_KIND },
  [FUEL_LIGNITE] = { 0.87, BY_KIND }, [FUEL_WOOD] = { 0.87, BY_KIND }, [FUEL_WASTE] = { 0.83, BY_KIND },
};
static const HlChoiceDefault fuel_excess_air[N_FUELS] = {
  [FUEL_NATURAL_GAS] = { 0.10, COMMON_PRACTICE }, [FUEL_DIESEL_OIL] = { 0.15, COMMON_PRACTICE }, [FUEL_RESIDUAL_OIL] = { 0.15, COMMON_PRACTICE },
  [FUEL_ANTHRACITE] = { 0.25, COMMON_PRACTICE }, [FUEL_BITUMINOUS_COAL] = { 0.20, COMMON_PRACTICE },
  [FUEL_SUB_BITUMINOUS_COAL] = { 0.20, COMMON_PRACTICE }, [FUEL_LIGNITE] = { 0.25, COMMON_PRACTICE }, [FUEL_WOOD] = { 0.35, COMMON_PRACTICE },
  [FUEL_WASTE] = { 0.60, COMMON_PRACTICE },
};
static const HlChoiceDefault fuel_unburned[N_FUELS] = {
  [FUEL_ANTHRACITE] = { 0.02, COMMON_PRACTICE }, [FUEL_BITUMINOUS_COAL] = { 0.01, COMMON_PRACTICE },
  [FUEL_SUB_BITUMINOUS_COAL] = { 0.01, COMMON_PRACTICE }, [FUEL_LIGNITE] = { 0.01, COMMON_PRACTICE }, [FUEL_WOOD] = { 0.01, COMMON_PRACTICE },
  [FUEL_WASTE] = { 0.015, COMMON_PRACTICE },
};
static const HlChoiceDefault fuel_dry_gas[N_FUELS] = {
  [FUEL_NATURAL_GAS] = { 0.66, SIEGERT }, [FUEL_DIESEL_OIL] = { 0.68, SIEGERT }, [FUEL_RESIDUAL_OIL] = { 0.68, SIEGERT },
  [FUEL_ANTHRACITE] = { 0.70, SIEGERT_OURS }, [FUEL_BITUMINOUS_COAL] = { 0.70, SIEGERT_OURS },
  [FUEL_SUB_BITUMINOUS_COAL] = { 0.71, SIEGERT_OURS }, [FUEL_LIGNITE] = { 0.76, SIEGERT_OURS }, [FUEL_WOOD] = { 0.71, SIEGERT_OURS },
  [FUEL_WASTE] = { 0.76, SIEGERT_OURS },
};
static const HlChoiceDefault fuel_wet_gas[N_FUELS] = {
  [FUEL_NATURAL_GAS] = { 0.009, SIEGERT }, [FUEL_DIESEL_OIL] = { 0.007, SIEGERT }, [FUEL_RESIDUAL_OIL] = { 0.007, SIEGERT },
  [FUEL_ANTHRACITE] = { 0.003, SIEGERT_OURS }, [FUEL_BITUMINOUS_COAL] = { 0.003, SIEGERT_OURS },
  [FUEL_SUB_BITUMINOUS_COAL] = { 0.006, SIEGERT_OURS }, [FUEL_LIGNITE] = { 0.010, SIEGERT_OURS }, [FUEL_WOOD] = { 0.007, SIEGERT_OURS },
  [FUEL_WASTE] = { 0.011, SIEGERT_OURS },
};
static const HlChoiceDefault fuel_radiation[N_FUELS] = {
  [FUEL_NATURAL_GAS] = { 0.0113, EN_RADIATION }, [FUEL_DIESEL_OIL] = { 0.0113, EN_RADIATION }, [FUEL_RESIDUAL_OIL] = { 0.0113, EN_RADIATION },
  [FUEL_ANTHRACITE] = { 0.0220, EN_RADIATION }, [FUEL_BITUMINOUS_COAL] = { 0.0220, EN_RADIATION },
  [FUEL_SUB_BITUMINOUS_COAL] = { 0.0220, EN_RADIATION }, [FUEL_LIGNITE] = { 0.0315, EN_RADIATION }, [FUEL_WOOD] = { 0.0315, EN_RADIATION },
  [FUEL_WASTE] = { 0.0315, EN_RADIATION },
};
static const HlChoiceDefault fuel_exergy[N_FUELS] = {
  [FUEL_NATURAL_GAS] = { 1.04, EXERGY_RATIOS }, [FUEL_DIESEL_OIL] = { 1.06, EXERGY_RATIOS }, [FUEL_RESIDUAL_OIL] = { 1.06, EXERGY_RATIOS },
  [FUEL_ANTHRACITE] = { 1.06, EXERGY_RATIOS }, [FUEL_BITUMINOUS_COAL] = { 1.08, EXERGY_RATIOS }, [FUEL_SUB_BITUMINOUS_COAL] = { 1.10, EXERGY_RATIOS },
  [FUEL_LIGNITE] = { 1.17, EXERGY_RATIOS }, [FUEL_WOOD] = { 1.20, EXERGY_RATIOS }, [FUEL_WASTE] = { 1.20, EXERGY_AS_WOOD },
};
