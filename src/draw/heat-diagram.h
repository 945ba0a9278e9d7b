/* The heat diagram: temperature over duty of one exchanger, or the composite curves of all, with pinch and zones.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#pragma once
#include "draw/theme.h"
#include "engine/heat-curve.h"
G_BEGIN_DECLS

typedef struct _HlHeatDiagram HlHeatDiagram;
HlHeatDiagram *hl_heat_diagram_new  (const HlSolution *solution, int component, HlUnitSet units, double width, double height);
void           hl_heat_diagram_free (HlHeatDiagram *diagram);
void           hl_heat_diagram_draw (const HlHeatDiagram *diagram, cairo_t *cr, const HlTheme *theme, gboolean is_stale);
G_DEFINE_AUTOPTR_CLEANUP_FUNC (HlHeatDiagram, hl_heat_diagram_free)
G_END_DECLS
