/* Fired boiler: a heat source with fuel, efficiency and losses.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "engine/components/heat-source.h"
#include "plant/i18n.h"

static void
emit_boiler (HlEmit *emit)
{
  int heat = hl_heat_source_emit (emit);
  int efficiency = hl_emit_own (emit, "efficiency", HL_VAR_RATIO), fuel_heat = hl_emit_own (emit, "fuel_heat", HL_VAR_POWER);
  int lhv = hl_emit_own (emit, "fuel_lhv", HL_VAR_ENTHALPY), flow = hl_emit_own (emit, "fuel_flow", HL_VAR_FLOW);
  int loss = hl_emit_own (emit, "flue_loss", HL_VAR_POWER);
  hl_emit_own (emit, "fuel_hhv_ratio", HL_VAR_RATIO);
  hl_emit_done (emit, hl_add_quotient (emit->system, fuel_heat, heat, efficiency), NULL, 0);
  hl_emit_done (emit, hl_add_quotient (emit->system, flow, fuel_heat, lhv), NULL, 0);
  hl_emit_done (emit, hl_add_linear (emit->system, HL_VAR_POWER, (const int[]) { loss, fuel_heat, heat },
                                     (const double[]) { 1.0, -1.0, 1.0 }, 3, 0.0), N_("{0} = {1} − {2}"), 0);
  hl_emit_sum (emit, HL_SUM_FUEL_HEAT, fuel_heat);
  hl_emit_sum (emit, HL_SUM_FUEL_FLOW, flow);
}

const HlComponentModel hl_boiler_model = { "boiler", emit_boiler, hl_heat_source_check, hl_heat_source_processes };
