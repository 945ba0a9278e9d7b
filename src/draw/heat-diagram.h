/* The heat diagram: temperature over duty of one exchanger, or the composite curves of all, with pinch and zones.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#pragma once
#include "draw/theme.h"
G_BEGIN_DECLS

/* A point of a curve; @look: what lies between the point before and this one. */
typedef struct { double heat, T; HlLook look; } HlHeatPoint;

/* Both sides over the duty, from the cold end on, as in counterflow. */
typedef struct {
  GArray  *hot, *cold;         /* of HlHeatPoint, rising heat [W]; empty where that side is not known, as at a boiler or a steam user */
  GArray  *borders;            /* of double: duty where a zone ends inside the exchanger, rising */
  double   duty;               /* of the longer side */
  gboolean has_pinch;
  double   pinch_heat, pinch;  /* where the least difference is, and how large [K]; below 0 the curves cross */
} HlHeatCurve;

/* As component: all exchangers of which both sides are known, each side's curves added up by temperature. */
#define HL_HEAT_ALL (-1)

/* NULL where nothing is known of a heat transfer in that component. */
HlHeatCurve *hl_heat_curve_new        (const HlSolution *solution, int component);
void         hl_heat_curve_free       (HlHeatCurve *curve);
/* Temperature of a side at a duty; NaN outside of it. */
double       hl_heat_curve_at         (const GArray *side, double heat);
double       hl_heat_curve_difference (const HlHeatCurve *curve, double heat);
/* Components for which there is a curve; element-type guint. */
GArray      *hl_heat_exchangers       (const HlSolution *solution);
G_DEFINE_AUTOPTR_CLEANUP_FUNC (HlHeatCurve, hl_heat_curve_free)

typedef struct _HlHeatDiagram HlHeatDiagram;
HlHeatDiagram *hl_heat_diagram_new  (const HlSolution *solution, int component, HlUnitSet units, double width, double height);
void           hl_heat_diagram_free (HlHeatDiagram *diagram);
void           hl_heat_diagram_draw (const HlHeatDiagram *diagram, cairo_t *cr, const HlTheme *theme, gboolean is_stale);
G_DEFINE_AUTOPTR_CLEANUP_FUNC (HlHeatDiagram, hl_heat_diagram_free)
G_END_DECLS
