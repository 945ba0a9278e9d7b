/* The list of kinds in shelf order, and look-ups in it.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "plant/kinds/kinds.h"

static const HlKind *const kinds[] = {
  &hl_kind_boiler, &hl_kind_heat_input, &hl_kind_exchanger, &hl_kind_recuperator, &hl_kind_evaporator, &hl_kind_solar_field,
  &hl_kind_gas_source, &hl_kind_superheater, &hl_kind_reheater, &hl_kind_evaporator_drum, &hl_kind_economiser, &hl_kind_air_preheater,
  &hl_kind_steam_air_heater, &hl_kind_flue_gas_condenser, &hl_kind_fan, &hl_kind_stack,
  &hl_kind_turbine, &hl_kind_expander, &hl_kind_control_stage, &hl_kind_gland_seal, &hl_kind_moisture_separator, &hl_kind_bypass_station, &hl_kind_compressor, &hl_kind_expansion_valve, &hl_kind_generator, &hl_kind_gearbox,
  &hl_kind_condenser, &hl_kind_air_condenser, &hl_kind_cooling_tower, &hl_kind_hotwell, &hl_kind_ejector,
  &hl_kind_pump, &hl_kind_motor, &hl_kind_feed_pump_turbine, &hl_kind_drain_pump, &hl_kind_open_heater, &hl_kind_flash_vessel, &hl_kind_closed_heater, &hl_kind_make_up,
  &hl_kind_pipe, &hl_kind_valve, &hl_kind_desuperheater, &hl_kind_splitter, &hl_kind_mixer, &hl_kind_header, &hl_kind_boundary,
  &hl_kind_steam_user, &hl_kind_district_heater,
};

guint
hl_kind_count (void)
{
  return G_N_ELEMENTS (kinds);
}

const HlKind *
hl_kind_nth (guint n)
{
  g_return_val_if_fail (n < G_N_ELEMENTS (kinds), NULL);
  return kinds[n];
}

const HlKind *
hl_kind_lookup (const char *id)
{
  g_return_val_if_fail (id != NULL, NULL);
  for (guint i = 0; i < G_N_ELEMENTS (kinds); i++)
    if (g_str_equal (kinds[i]->id, id))
      return kinds[i];
  return NULL;
}

int
hl_kind_find_option (const HlKind *kind, const char *key)
{
  g_return_val_if_fail (kind != NULL && key != NULL, -1);
  for (guint i = 0; i < kind->n_options; i++)
    if (g_str_equal (kind->options[i].key, key))
      return (int) i;
  return -1;
}
