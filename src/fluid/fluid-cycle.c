/* A simple cycle with one medium between a heat source and a sink, to compare media.  SI throughout.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "fluid/fluid-cycle.h"
#include <math.h>

/* Closer to the critical temperature liquid and vapour hardly differ. */
#define LEAST_BELOW_CRITICAL 5.0

static HlCyclePossible
follow (const HlFluid *fluid, HlFluidCycle *cycle)
{
  HlSaturation hot, cold;
  HlState ideal, out, pumped;
  if (hl_fluid_saturation_T (fluid, cycle->T_evaporation, &hot) != HL_OK || hl_fluid_saturation_T (fluid, cycle->T_condensation, &cold) != HL_OK
      || hl_fluid_state_ps (fluid, cold.p, hot.s_vapour, &ideal) != HL_OK || hl_fluid_state_ps (fluid, hot.p, cold.s_liquid, &pumped) != HL_OK)
    return HL_CYCLE_OUTSIDE;
  double drop = HL_CYCLE_EXPANDER * (hot.h_vapour - ideal.h), rise = (pumped.h - cold.h_liquid) / HL_CYCLE_PUMP;
  if (!(drop > rise) || hl_fluid_state_ph (fluid, cold.p, hot.h_vapour - drop, &out) != HL_OK)
    return HL_CYCLE_OUTSIDE;
  cycle->p_evaporation = hot.p;
  cycle->p_condensation = cold.p;
  cycle->volume_ratio = out.v / hot.v_vapour;
  cycle->volume_per_work = out.v / (drop - rise);
  cycle->efficiency = (drop - rise) / (hot.h_vapour - cold.h_liquid - rise);
  cycle->moisture = out.phase == HL_PHASE_TWO_PHASE ? 1.0 - out.x : 0.0;
  cycle->superheat = out.phase == HL_PHASE_TWO_PHASE ? 0.0 : out.T - cold.T;
  return HL_CYCLE_POSSIBLE;
}

void
hl_fluid_cycle (const HlFluid *fluid, double T_source, double T_sink, HlFluidCycle *cycle)
{
  HlFluidLimits limits;
  *cycle = (HlFluidCycle) { .T_evaporation = T_source - HL_CYCLE_APPROACH, .T_condensation = T_sink + HL_CYCLE_APPROACH,
                            .p_evaporation = NAN, .p_condensation = NAN, .volume_ratio = NAN, .volume_per_work = NAN, .efficiency = NAN,
                            .moisture = NAN, .superheat = NAN };
  hl_fluid_limits (fluid, &limits);
  if (!hl_fluid_has_dome (fluid))
    cycle->possible = HL_CYCLE_NO_DOME;
  else if (!(cycle->T_evaporation > cycle->T_condensation + 1.0))
    cycle->possible = HL_CYCLE_NO_DIFFERENCE;
  else if (!(cycle->T_evaporation <= limits.T_critical - LEAST_BELOW_CRITICAL))
    cycle->possible = HL_CYCLE_ABOVE_CRITICAL;
  else if (!(cycle->T_condensation >= limits.T_min))
    cycle->possible = HL_CYCLE_BELOW_RANGE;
  else
    cycle->possible = follow (fluid, cycle);
}
