/* A simple cycle with one medium between a heat source and a sink, to compare media.  SI throughout.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#pragma once
#include "fluid/fluid.h"
G_BEGIN_DECLS

/* Evaporation lies this far below the source, condensation this far above the sink [K]: a first guess, no source. */
#define HL_CYCLE_APPROACH 10.0
/* Isentropic efficiencies of expander and pump: common practice for organic cycles, no source. */
#define HL_CYCLE_EXPANDER 0.82
#define HL_CYCLE_PUMP     0.65

typedef enum {
  HL_CYCLE_POSSIBLE,
  HL_CYCLE_NO_DOME,             /* a gas: nothing evaporates */
  HL_CYCLE_ABOVE_CRITICAL,      /* evaporation would lie above, or within 5 K below, the critical temperature */
  HL_CYCLE_BELOW_RANGE,         /* condensation would lie below the range of the equation of state, or where it freezes */
  HL_CYCLE_OUTSIDE,             /* some other state lies outside the range */
  HL_CYCLE_NO_DIFFERENCE,       /* source and sink are too close for the approaches */
} HlCyclePossible;

typedef struct {
  HlCyclePossible possible;     /* below: only where POSSIBLE */
  double T_evaporation, T_condensation;
  double p_evaporation, p_condensation;
  double volume_ratio;          /* exhaust over inlet of the expander */
  double volume_per_work;       /* exhaust volume for each joule of net work [m3/J]: size of the machine */
  double efficiency;            /* (expander work - pump work) / heat taken up */
  double moisture;              /* liquid fraction at the exhaust; 0 where dry */
  double superheat;             /* of the exhaust above condensation [K]; 0 where wet */
} HlFluidCycle;

/* Saturated vapour is expanded, condensed to saturated liquid, pumped back; no recuperator, no pressure losses.  The same states for
 * every medium, so that they compare; no medium's best. */
HL_PUBLIC void hl_fluid_cycle (const HlFluid *fluid, double T_source, double T_sink, HlFluidCycle *cycle);
G_END_DECLS
