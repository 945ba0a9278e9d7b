/* Temperatures of two streams in counterflow over the heat that passes between them.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#pragma once
#include "engine/equations.h"
G_BEGIN_DECLS

/* Pressures are carried as logarithms; enthalpies [J/kg]. */
enum { HL_CURVE_P_HOT_IN, HL_CURVE_H_HOT_IN, HL_CURVE_P_HOT_OUT, HL_CURVE_H_HOT_OUT,
       HL_CURVE_P_COLD_IN, HL_CURVE_H_COLD_IN, HL_CURVE_P_COLD_OUT, HL_CURVE_H_COLD_OUT, HL_N_CURVE_INPUTS };

#define HL_CURVE_PARTS 24
#define HL_CURVE_MOST  (HL_CURVE_PARTS + 1 + 4)   /* even shares, and where a stream begins or ends to boil or condense */

typedef struct {
  int    n;
  double share[HL_CURVE_MOST];      /* of the heat, from the cold end: 0 to 1 */
  double hot[HL_CURVE_MOST], cold[HL_CURVE_MOST];   /* [K] */
} HlExchangerCurve;

HlStatus hl_exchanger_curve (const HlFluid *hot, const HlFluid *cold, const double inputs[HL_N_CURVE_INPUTS], HlExchangerCurve *curve);

/* pinch = least difference along the curve. */
HlEquation *hl_add_exchanger_pinch (HlSystem *system, const HlFluid *hot, const HlFluid *cold, const int inputs[HL_N_CURVE_INPUTS], int pinch);
/* conductance = sum over the parts of the curve of heat over logarithmic mean difference. */
HlEquation *hl_add_exchanger_conductance (HlSystem *system, const HlFluid *hot, const HlFluid *cold, const int inputs[HL_N_CURVE_INPUTS],
                                          int heat, int conductance);
/* effectiveness = heat over what would pass if the stream that can take less left at the other's inlet temperature. */
HlEquation *hl_add_exchanger_effectiveness (HlSystem *system, const HlFluid *hot, const HlFluid *cold, const int inputs[HL_N_CURVE_INPUTS],
                                            int m_hot, int m_cold, int heat, int effectiveness);
G_END_DECLS
