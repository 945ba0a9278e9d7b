/* The tables of all kinds, and shorthand for their rows.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#pragma once
#include <math.h>
#include "plant/kind.h"
#include "plant/i18n.h"

extern const HlKind hl_kind_heat_input, hl_kind_boiler, hl_kind_turbine, hl_kind_generator, hl_kind_condenser,
                    hl_kind_pump, hl_kind_open_heater, hl_kind_closed_heater, hl_kind_make_up,
                    hl_kind_pipe, hl_kind_valve, hl_kind_splitter, hl_kind_mixer, hl_kind_boundary, hl_kind_steam_user,
                    hl_kind_exchanger, hl_kind_recuperator, hl_kind_district_heater, hl_kind_air_condenser,
                    hl_kind_cooling_tower, hl_kind_flash_vessel, hl_kind_moisture_separator, hl_kind_desuperheater,
                    hl_kind_compressor, hl_kind_gearbox, hl_kind_motor,
                    hl_kind_feed_pump_turbine, hl_kind_ejector, hl_kind_gland_seal, hl_kind_control_stage,
                    hl_kind_hotwell, hl_kind_header, hl_kind_bypass_station, hl_kind_drain_pump,
                    hl_kind_expander, hl_kind_evaporator, hl_kind_expansion_valve,
                    hl_kind_economiser, hl_kind_evaporator_drum, hl_kind_superheater, hl_kind_reheater, hl_kind_air_preheater, hl_kind_steam_air_heater,
                    hl_kind_flue_gas_condenser, hl_kind_gas_source, hl_kind_stack, hl_kind_fan, hl_kind_solar_field;

/* Words used by more than one table. */
#define COMMON_PRACTICE N_("common practice, no source")

/* Every row says its default, its credible range and its hard limits; these are the recurring ones. */
#define NO_DEFAULT         .default_value = NAN, .default_source = NULL
#define DEFAULT(value, source) .default_value = (value), .default_source = (source)
#define NO_RANGE           .credible_low = NAN, .credible_high = NAN
#define RANGE(low, high)   .credible_low = (low), .credible_high = (high)
#define LIMITS(over, most) .above = (over), .at_most = (most)
#define LIMITS_EFFICIENCY  LIMITS (0.0, 1.0)
#define LIMITS_FRACTION    LIMITS (HL_FROM_ZERO, 1.0)
#define LIMITS_LOSS        LIMITS (HL_FROM_ZERO, 0.999)      /* a loss of all pressure leaves no state */
#define LIMITS_PRESSURE    LIMITS (0.0, 1e9)
#define LIMITS_TEMPERATURE LIMITS (0.0, 3000.0)
#define LIMITS_POWER       LIMITS (HL_FROM_ZERO, 1e12)
#define LIMITS_FLOW        LIMITS (HL_FROM_ZERO, 1e6)
#define LIMITS_DIFFERENCE  LIMITS (HL_FROM_ZERO, 1000.0)
#define LIMITS_CONDUCTANCE LIMITS (HL_FROM_ZERO, 1e12)

/* Where the level of a vessel, or the axis of a pump, lies: counts only for the NPSH of pumps. */
#define ELEVATION \
  { .key = "elevation", .sign = "z", .name = N_("Elevation"), .group = N_("Place"), \
    .dimension = HL_DIMENSION_LENGTH, .flags = 0, NO_DEFAULT, RANGE (-20.0, 120.0), LIMITS (-1e4, 1e4), .yield_rank = 95, \
    .help = N_("Height of its liquid level, or of a pump's axis, above the plant's floor; only the NPSH of pumps counts it.") },

/* One row per argument. */
#define ROWS(array) array, G_N_ELEMENTS (array)
