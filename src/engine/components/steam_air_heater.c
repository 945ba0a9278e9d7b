/* Steam air heater: condensing steam warms air.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "engine/components/exchange.h"
#include "plant/i18n.h"

#define NODE(emit, n) hl_model_node ((emit)->model, n)

static const HlExchangeSides sides = { "steam", "drain", "air_inlet", "air_outlet", NULL, "air_pressure_loss" };

static void
emit_steam_air_heater (HlEmit *emit)
{
  int steam = hl_emit_port (emit, "steam"), drain = hl_emit_port (emit, "drain"), out = hl_emit_port (emit, "air_outlet");
  hl_emit_guess (emit, steam, 2.8e6);
  hl_exchange_emit_sides (emit, &sides);
  int T_sat = hl_emit_hidden (emit, "saturation_T", HL_VAR_TEMPERATURE);
  int difference = hl_emit_own (emit, "terminal_difference", HL_VAR_TEMPERATURE_DIFFERENCE);
  int subcooling = hl_emit_own (emit, "drain_subcooling", HL_VAR_TEMPERATURE_DIFFERENCE);
  int T_out = hl_emit_T (emit, out, hl_emit_has_value (emit, "terminal_difference"));
  NODE (emit, drain)->subcooling = subcooling;
  hl_emit_done (emit, hl_add_liquid (emit->system, NODE (emit, drain)->fluid, NODE (emit, drain)->p, subcooling, NODE (emit, drain)->h), NULL, -1);
  hl_emit_done (emit, hl_add_saturation (emit->system, NODE (emit, steam)->fluid, NODE (emit, steam)->p, T_sat), NULL, 1);
  hl_emit_done (emit, hl_add_linear (emit->system, HL_VAR_TEMPERATURE, (const int[]) { difference, T_sat, T_out }, (const double[]) { 1.0, -1.0, 1.0 }, 3, 0.0),
                N_("{0} = {1} − {2}"), 0);
}

static void
check (HlChecker *checker)
{
  hl_exchange_check_sides (checker, &sides);
}

static void
processes (HlProcessSink *sink)
{
  hl_exchange_processes_sides (sink, &sides);
}

const HlComponentModel hl_steam_air_heater_model = { "steam_air_heater", emit_steam_air_heater, check, processes };
