/* State diagrams (T-s, h-s, log p-h): dome, isobars, quality lines, process paths, numbered states.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#pragma once
#include "draw/theme.h"
G_BEGIN_DECLS

/* What the diagram shows and where: computed once per solution and size, drawn as often as needed. */
typedef struct _HlStateDiagram HlStateDiagram;
typedef enum {
  HL_STATE_DIAGRAM_TS,          /* temperature over entropy */
  HL_STATE_DIAGRAM_HS,          /* enthalpy over entropy */
  HL_STATE_DIAGRAM_PH,          /* pressure, by decades, over enthalpy */
  HL_N_STATE_DIAGRAMS
} HlStateDiagramKind;
/* "T-s" for choosers; the word of the batch program, "ts"; "Temperature-entropy diagram", translated. */
const char     *hl_state_diagram_sign  (HlStateDiagramKind kind);
const char     *hl_state_diagram_id    (HlStateDiagramKind kind);
const char     *hl_state_diagram_title (HlStateDiagramKind kind);
gboolean        hl_state_diagram_kind_from_id (const char *id, HlStateDiagramKind *kind);

/* What it may show beside the cycle; flags. */
typedef enum {
  HL_DIAGRAM_AREAS   = 1 << 0,  /* T-s: below the ways on which heat comes from outside or leaves, down to the axis */
  HL_DIAGRAM_SOURCES = 1 << 1,  /* T-s: temperature of the other side of those ways, where it is known */
  HL_DIAGRAM_TABLE   = 1 << 2,  /* the states in figures, at the right, where there is room */
  HL_DIAGRAM_ISOBARS = 1 << 3,  /* T-s, h-s: at round pressures too, not only at the cycle's own */
} HlDiagramExtras;
#define HL_N_DIAGRAM_EXTRAS 4
const char     *hl_diagram_extra_id     (guint n);     /* "areas" */
const char     *hl_diagram_extra_name   (guint n);     /* translated */
gboolean        hl_diagram_extras_parse (const char *text, guint *flags);     /* "areas,table"; FALSE where a word is none */

HlStateDiagram *hl_state_diagram_new   (const HlSolution *solution, HlUnitSet units, double width, double height);   /* T-s; pixels */
HlStateDiagram *hl_state_diagram_new_of_kind (const HlSolution *solution, HlStateDiagramKind kind, HlUnitSet units, double width, double height);
HlStateDiagram *hl_state_diagram_new_with (const HlSolution *solution, HlStateDiagramKind kind, guint extras, HlUnitSet units, double width, double height);
/* Of the same kind, extras, size and axes as @other, so that both can be drawn over each other; a state may then lie outside. */
HlStateDiagram *hl_state_diagram_new_on (const HlSolution *solution, const HlStateDiagram *other);
void            hl_state_diagram_free  (HlStateDiagram *diagram);
/* @stale: drawn grey (last solve failed). @selected_stream: index ringed, or -1. */
void            hl_state_diagram_draw  (const HlStateDiagram *diagram, cairo_t *cr, const HlTheme *theme, gboolean is_stale, int selected_stream);
/* The same with @ghost (nullable, on the same axes) beneath it: its processes and states, grey and pale. */
void            hl_state_diagram_draw_over (const HlStateDiagram *diagram, const HlStateDiagram *ghost, cairo_t *cr, const HlTheme *theme,
                                            gboolean is_stale, int selected_stream);
int             hl_state_diagram_stream_at (const HlStateDiagram *diagram, double x, double y, double within);   /* -1: none */
/* Pixels to what the axes show and back; FALSE outside the axes.  T-s: s [J/(kg K)], T [K]; h-s: s, h [J/kg]; p-h: h, p [Pa]. */
gboolean        hl_state_diagram_to_state (const HlStateDiagram *diagram, double x, double y, double *across, double *up);
void            hl_state_diagram_to_pixel (const HlStateDiagram *diagram, double across, double up, double *x, double *y);
/* Dimensions of the two axes, across and up. */
void            hl_state_diagram_dimensions (HlStateDiagramKind kind, HlDimension *across, HlDimension *up);
G_DEFINE_AUTOPTR_CLEANUP_FUNC (HlStateDiagram, hl_state_diagram_free)
G_END_DECLS
