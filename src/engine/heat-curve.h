/* Temperature over heat of exchangers: both sides as curves, pinch and zones; composite curves of all.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#pragma once
#include "engine/solution.h"
G_BEGIN_DECLS

/* What a line carries: medium and state together. */
typedef enum {
  HL_LOOK_UNKNOWN,       /* state not known */
  HL_LOOK_STEAM,
  HL_LOOK_WET,
  HL_LOOK_WATER,
  HL_LOOK_COOLING,       /* water that carries heat away: only the plant tells, not the state */
  HL_LOOK_GAS,
  HL_N_LOOKS
} HlLook;
HL_PUBLIC HlLook hl_stream_look (const HlStreamResult *result);            /* from the state alone: never COOLING; NULL: UNKNOWN */

/* A point of a curve; @look: what lies between the point before and this one. */
typedef struct { double heat, T; HlLook look; } HlHeatPoint;

/* From one change of phase to the next, in counterflow; the first lies at the cold end. */
typedef struct {
  double heat;                               /* [W] */
  double hot_in, hot_out, cold_in, cold_out; /* [K] */
  double mean_difference;                    /* heat over conductance [K]; NaN where the curves touch or cross */
  double conductance;                        /* sum of heat over logarithmic mean difference, part by part [W/K] */
  HlLook hot, cold;                          /* what is in it */
} HlHeatZone;

/* Both sides over the duty, from the cold end on, as in counterflow. */
typedef struct {
  GArray  *hot, *cold;         /* of HlHeatPoint, rising heat [W]; empty where that side is not known, as at a boiler or a steam user */
  GArray  *borders;            /* of double: duty where a zone ends inside the exchanger, rising */
  GArray  *zones;              /* of HlHeatZone; none where a side is not known, or of composite curves */
  double   duty;               /* of the longer side */
  gboolean has_pinch;
  double   pinch_heat, pinch;  /* where the least difference is, and how large [K]; below 0 the curves cross */
} HlHeatCurve;

/* As component: all exchangers of which both sides are known, each side's curves added up by temperature. */
#define HL_HEAT_ALL (-1)

/* NULL where nothing is known of a heat transfer in that component. */
HL_PUBLIC HlHeatCurve *hl_heat_curve_new        (const HlSolution *solution, int component);
HL_PUBLIC void         hl_heat_curve_free       (HlHeatCurve *curve);
/* Temperature of a side at a duty; NaN outside of it. */
HL_PUBLIC double       hl_heat_curve_at         (const GArray *side, double heat);
HL_PUBLIC double       hl_heat_curve_difference (const HlHeatCurve *curve, double heat);
/* Components for which there is a curve; element-type guint. */
HL_PUBLIC GArray      *hl_heat_exchangers       (const HlSolution *solution);
G_DEFINE_AUTOPTR_CLEANUP_FUNC (HlHeatCurve, hl_heat_curve_free)
G_END_DECLS
