/* The list of kinds that the engine knows.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "engine/components/components.h"

static const HlComponentModel *const models[] = {
  &hl_heat_input_model, &hl_boiler_model, &hl_turbine_model, &hl_generator_model, &hl_condenser_model, &hl_pump_model, &hl_pipe_model,
  &hl_valve_model, &hl_open_heater_model, &hl_closed_heater_model, &hl_splitter_model, &hl_mixer_model, &hl_steam_user_model,
  &hl_make_up_model, &hl_boundary_model, &hl_motor_model, &hl_gearbox_model, &hl_compressor_model, &hl_desuperheater_model, &hl_moisture_separator_model, &hl_flash_vessel_model, &hl_cooling_tower_model, &hl_air_condenser_model, &hl_district_heater_model, &hl_recuperator_model, &hl_exchanger_model,
  &hl_feed_pump_turbine_model, &hl_ejector_model, &hl_gland_seal_model, &hl_control_stage_model, &hl_hotwell_model, &hl_header_model, &hl_bypass_station_model, &hl_drain_pump_model,
  &hl_expander_model, &hl_evaporator_model, &hl_expansion_valve_model,
  &hl_economiser_model, &hl_evaporator_drum_model, &hl_superheater_model, &hl_reheater_model, &hl_air_preheater_model, &hl_steam_air_heater_model,
  &hl_flue_gas_condenser_model, &hl_gas_source_model, &hl_stack_model, &hl_fan_model, &hl_solar_field_model,
};

const HlComponentModel *
hl_component_model (const HlKind *kind)
{
  for (guint k = 0; k < G_N_ELEMENTS (models); k++)
    if (g_str_equal (models[k]->kind, kind->id))
      return models[k];
  return NULL;
}
