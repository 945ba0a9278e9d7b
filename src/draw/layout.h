/* Where lines and labels lie on the canvas: pure geometry in pixels at zoom 1, no cairo.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#pragma once
#include "draw/symbols.h"
G_BEGIN_DECLS

typedef struct { double x, y; } HlPoint;
typedef struct { double x, y, width, height; } HlBox;

typedef struct {
  guint    n_points;
  HlPoint *points;           /* orthogonal polyline from outlet to inlet */
  double   lead_from, lead_to;   /* pixels that the line goes on beneath the symbols at its ends */
  guint    n_arcs;
  HlPoint *arcs;             /* where this line, horizontal there, jumps over a vertical one */
  HlLook   look;             /* medium and state; unknown without solution */
  HlBox    label;            /* empty width: no label.  A hand-set place is the label's centre [grid units] */
  gboolean has_leader;       /* the label had to move away from its line: a hairline leads back */
  HlPoint  leader[2];        /* from the line to the label's edge */
  char    *label_lines[2];   /* "16.67 kg/s", "65 bar · 485.0 °C"; NULL without solution, or where not known */
} HlStreamPlace;

typedef struct {
  HlBox    title;            /* id, name and a key figure beside the symbol */
  char    *title_lines[2];   /* "T1 high pressure", "14.89 MW · η 0.830"; the second may be NULL */
  int      title_align;      /* -1 left of the anchor, 0 centred, 1 right */
} HlComponentPlace;

typedef struct _HlLayout HlLayout;
/* @solution: (nullable): without it there are no labels. Measures text with pango. */
HlLayout               *hl_layout_new       (const HlPlant *plant, const HlSolution *solution, const HlTheme *theme);
/* The same, keeping every line and label of @previous (nullable) that still fits: fast enough for each step of a drag,
 * and what is not touched stays where it is.  When the drag is over a fresh hl_layout_new() tidies up. */
HlLayout               *hl_layout_next      (const HlLayout *previous, const HlPlant *plant, const HlSolution *solution, const HlTheme *theme);
HlLayout               *hl_layout_ref       (HlLayout *layout);
void                    hl_layout_unref     (HlLayout *layout);
const HlStreamPlace    *hl_layout_stream    (const HlLayout *layout, guint stream);
const HlComponentPlace *hl_layout_component (const HlLayout *layout, guint component);
void                    hl_layout_extents   (const HlLayout *layout, HlBox *box);        /* everything drawn, with a margin */
int                     hl_layout_stream_at (const HlLayout *layout, double x, double y, double within);  /* index, -1 none: line or label */
/* The free-hand route of a line being drawn from a port to a point (for the rubber line). g_free() the points. */
HlPoint                *hl_route_preview    (const HlPlant *plant, const char *from_id, const char *from_port, double x, double y, guint *n);
/* Polylines of shafts, one a link between two neighbours; to be drawn beneath the symbols. */
guint                   hl_layout_n_shafts  (const HlLayout *layout);
const HlPoint          *hl_layout_shaft     (const HlLayout *layout, guint n, guint *n_points);
G_DEFINE_AUTOPTR_CLEANUP_FUNC (HlLayout, hl_layout_unref)
G_END_DECLS
