/* Cycles for tests of the state diagram, made straight from property calls: no plant, no solver.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#pragma once
#include "draw/state-diagram-private.h"
G_BEGIN_DECLS

/* Four states: 80 bar 480 °C to 0.08 bar, efficiency 0.85, pump 0.75. */
HlCycle *cycle_simple   (HlUnitSet units);
/* Extractions at 12, 6.3 and 2.6 bar, process steam, open and closed heater, boiler with a pressure loss. */
HlCycle *cycle_industry (HlUnitSet units);
/* Reheat and seven heaters; @p above the critical pressure makes a supercritical boiler. */
HlCycle *cycle_reheat   (HlUnitSet units, double p, double T);
/* @n states anywhere in the range of the formulation up to 250 bar and 700 °C, processes of all kinds between them; repeatable by @seed. */
HlCycle *cycle_random   (guint32 seed, guint n);
/* Where two states coincide in pixels, or cannot be told from each other, is the diagram's business: this says only what went in. */
const HlCyclePoint *cycle_point (const HlCycle *cycle, guint n);
G_END_DECLS
