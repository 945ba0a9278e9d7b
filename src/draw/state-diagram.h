/* The temperature-entropy diagram: dome, isobars, quality lines, process paths, numbered states.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#pragma once
#include "draw/theme.h"
G_BEGIN_DECLS

/* What the diagram shows and where: computed once per solution and size, drawn as often as needed. */
typedef struct _HlStateDiagram HlStateDiagram;
HlStateDiagram *hl_state_diagram_new   (const HlSolution *solution, HlUnitSet units, double width, double height);   /* pixels */
void            hl_state_diagram_free  (HlStateDiagram *diagram);
/* @stale: drawn grey (last solve failed). @selected_stream: index ringed, or -1. */
void            hl_state_diagram_draw  (const HlStateDiagram *diagram, cairo_t *cr, const HlTheme *theme, gboolean is_stale, int selected_stream);
int             hl_state_diagram_stream_at (const HlStateDiagram *diagram, double x, double y, double within);   /* -1: none */
/* Coordinates to (s [J/(kg K)], T [K]) and back; FALSE outside the axes. */
gboolean        hl_state_diagram_to_state (const HlStateDiagram *diagram, double x, double y, double *s, double *T);
void            hl_state_diagram_to_pixel (const HlStateDiagram *diagram, double s, double T, double *x, double *y);
G_DEFINE_AUTOPTR_CLEANUP_FUNC (HlStateDiagram, hl_state_diagram_free)
G_END_DECLS
