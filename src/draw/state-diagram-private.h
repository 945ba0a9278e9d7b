/* What the files of the state diagram share: the cycle as plain values, the dome, paths, and the finished picture.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#pragma once
#include "draw/plot-labels.h"
#include "draw/plot-layer.h"
#include "draw/state-diagram.h"
G_BEGIN_DECLS

/* The cycle to be shown, free of plant and solver. */
typedef struct {
  const char    *id;            /* the number in the picture */
  int            stream;        /* index that hit tests answer with */
  double         m;             /* [kg/s]; NaN unknown */
  HlState        state;
} HlCyclePoint;
typedef struct {
  const HlFluid *fluid;
  HlUnitSet      units;
  HlStateDiagramKind kind;      /* T-s unless set */
  GArray        *points;        /* of HlCyclePoint */
  GArray        *processes;     /* of HlProcess; none of a service circuit */
  guint          extras;        /* HlDiagramExtras */
  GPtrArray     *sources;       /* of HlPlotSeries: entropy and temperature of heat sources and sinks */
} HlCycle;
void            hl_cycle_add_sources   (HlCycle *cycle, const HlSolution *solution);
HlCycle        *hl_cycle_new           (const HlFluid *fluid, HlUnitSet units);
HlCycle        *hl_cycle_from_solution (const HlSolution *solution, HlUnitSet units);
void            hl_cycle_free          (HlCycle *cycle);
G_DEFINE_AUTOPTR_CLEANUP_FUNC (HlCycle, hl_cycle_free)

/* Saturation line of a fluid from the triple point to the critical point; computed on first use and kept. */
typedef struct {
  guint   n;
  double *T, *p, *s_liquid, *s_vapour, *h_liquid, *h_vapour;    /* [n], rising T; the last one is the critical point */
} HlDome;
const HlDome *hl_dome_of (const HlFluid *fluid);
/* Entropy of the saturation line at @T between two entries of the dome, for drawing; quality 0 to 1. */
double        hl_dome_entropy (const HlDome *dome, double T, double quality);
/* The same point where a diagram shows it. */
HlPoint       hl_dome_point   (const HlDome *dome, HlStateDiagramKind kind, double T, double quality);
HlPoint       hl_dome_nth     (const HlDome *dome, HlStateDiagramKind kind, guint n, double quality);

/* Where a state lies on the axes of a diagram. */
static inline HlPoint
hl_axes_point (HlStateDiagramKind kind, double p, double T, double h, double s)
{
  return (HlPoint) { kind == HL_STATE_DIAGRAM_PH ? h : s, kind == HL_STATE_DIAGRAM_TS ? T : kind == HL_STATE_DIAGRAM_HS ? h : p };
}
static inline HlPoint
hl_axes_state (HlStateDiagramKind kind, const HlState *state)
{
  return hl_axes_point (kind, state->p, state->T, state->h, state->s);
}

/* True path of a process in the diagram. */
typedef struct {
  double  s, T, p, h;
  HlLook  look;                 /* water, wet or steam: sets the colour */
} HlPathPoint;
/* Samples adaptively until the picture deviates by less than a fraction of a pixel; element-type HlPathPoint; never NULL.
 * Where a property call fails the path is the straight line between its ends. */
GArray *hl_process_path (const HlProcess *process, HlStateDiagramKind kind, const HlPlotAxis *x_axis, const HlPlotAxis *y_axis);
/* The isobar from the saturated liquid (above the critical pressure: from @T_low) to @T_high. */
GArray *hl_isobar_path  (const HlFluid *fluid, double p, double T_low, double T_high, HlStateDiagramKind kind, const HlPlotAxis *x_axis, const HlPlotAxis *y_axis);
/* The isotherm from @p_high down to @p_low, across the dome where it meets it; NaN as @p_high: from the saturated vapour.
 * @n_kept: (out): points up to and with the saturated vapour, 0 where there is none. */
GArray *hl_isotherm_path (const HlFluid *fluid, double T, double p_high, double p_low, HlStateDiagramKind kind, const HlPlotAxis *x_axis, const HlPlotAxis *y_axis, guint *n_kept);
/* The drop at constant entropy from the start of a process to its ideal end. */
GArray *hl_ideal_path    (const HlProcess *process, HlStateDiagramKind kind, const HlPlotAxis *x_axis, const HlPlotAxis *y_axis);

typedef enum {
  HL_MARK_STATE,                /* a numbered state, ringed */
  HL_MARK_IDEAL,                /* isentropic end point, a small ring */
} HlMarkKind;
typedef struct {
  HlMarkKind       kind;
  HlPoint          at;          /* pixels */
  double           radius;
  HlPlotColour     colour;
  guint            n_streams;
  int             *streams;     /* those that coincide here */
  char            *text;        /* "3, 4"; "2s" */
  HlPlotLabelPlace label;
} HlMark;

typedef enum { HL_TEXT_PRESSURE, HL_TEXT_QUALITY, HL_TEXT_ISOTHERM } HlTextKind;
typedef struct {
  HlTextKind kind;
  char      *text;
  HlBox      box;
} HlDiagramText;

/* The states in figures. */
typedef struct {
  guint    n_rows, n_columns;
  char   **cells;               /* [n_rows n_columns] */
  double   widths[8], width, row, size;
  gboolean is_cut;              /* more states than room */
} HlStateTable;
/* Returns the width that it takes from the diagram; 0 where there is none. */
double hl_state_table_set   (HlStateTable *table, const HlCycle *cycle, double width, double height, double text_size);
void   hl_state_table_clear (HlStateTable *table);

struct _HlStateDiagram {
  guint          extras;
  GPtrArray     *areas;                    /* of HlPlotSeries: upper edges, down to the axis */
  HlStateTable   table;
  double         panel;                    /* width at the right that the table takes */
  HlStateDiagramKind kind;
  double         width, height;
  double         text_size, number_size;   /* pixels */
  HlPlotAxis     x_axis, y_axis;
  HlBox          frame;                    /* plot area in pixels */
  const HlDome  *dome;
  HlPoint        critical;                 /* pixels */
  HlPlotSeries  *outline;                  /* the saturation line, left to right */
  HlPlotLayer   *background;               /* quality lines, isobars */
  HlPlotLayer   *paths;                    /* processes, and isentropic drops */
  GArray        *marks;                    /* of HlMark */
  GArray        *texts;                    /* of HlDiagramText */
  GArray        *gaps;                     /* of HlBox: where the background leaves room for texts */
};
HlStateDiagram *hl_state_diagram_from_cycle (const HlCycle *cycle, double width, double height);
/* On the axes of @other, or on its own where that is NULL. */
HlStateDiagram *hl_state_diagram_from_cycle_on (const HlCycle *cycle, const HlStateDiagram *other, double width, double height);
/* Steps of the above, in this order. */
void            hl_state_diagram_add_areas  (HlStateDiagram *diagram, const HlCycle *cycle);
void            hl_state_diagram_draw_areas (const HlStateDiagram *diagram, cairo_t *cr, const HlTheme *theme, gboolean is_stale);
void            hl_state_diagram_draw_table (const HlStateDiagram *diagram, cairo_t *cr, const HlTheme *theme);
void            hl_state_diagram_set_axes   (HlStateDiagram *diagram, const HlCycle *cycle);
void            hl_state_diagram_add_dome   (HlStateDiagram *diagram);
void            hl_state_diagram_add_paths  (HlStateDiagram *diagram, const HlCycle *cycle);
/* States closer than @within pixels share a dot. */
void            hl_state_diagram_add_marks  (HlStateDiagram *diagram, const HlCycle *cycle, double within);
GArray         *hl_state_diagram_add_isolines   (HlStateDiagram *diagram, const HlCycle *cycle, HlPlotLabels *labels);
void            hl_state_diagram_label_isolines (HlStateDiagram *diagram, const GArray *lines, HlPlotLabels *labels);
/* FALSE where some state's number found no room. */
gboolean        hl_state_diagram_add_texts  (HlStateDiagram *diagram, const HlCycle *cycle);
void            hl_state_diagram_clear_marks (HlStateDiagram *diagram);
/* Size of a text's box, good for every theme. */
void            hl_state_diagram_text_size  (const char *text, double size, gboolean is_bold, double *width, double *height);
/* Baseline of a text below the top of its box, as a share of the size. */
#define HL_TEXT_BASELINE 0.80
#define HL_TEXT_HEIGHT   1.04
G_END_DECLS
