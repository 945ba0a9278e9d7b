/* Places texts in a plot so that they collide with nothing: a geometry search, no cairo.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#pragma once
#include "draw/layout.h"
G_BEGIN_DECLS

/* What a text asks for. */
typedef struct {
  double  width, height;    /* of the text's box [pixels] */
  HlPoint anchor;           /* what it names */
  double  clearance;        /* least distance between anchor and box */
  double  reach;            /* the farthest distance worth trying */
  HlPoint towards;          /* preferred direction from the anchor, unit vector in pixels; 0, 0: upper right first */
} HlPlotLabelWish;

typedef struct {
  gboolean is_placed;
  HlBox    box;
  gboolean has_leader;
  HlPoint  leader[2];       /* from the dot's rim to the box */
} HlPlotLabelPlace;

typedef struct _HlPlotLabels HlPlotLabels;
/* Everything placed lies inside @frame. */
HlPlotLabels *hl_plot_labels_new       (const HlBox *frame);
void          hl_plot_labels_free      (HlPlotLabels *labels);
/* Lines may be crossed, but at a price: @weight is that of a pixel.  All lines come before the first text. */
void          hl_plot_labels_add_line  (HlPlotLabels *labels, HlPoint from, HlPoint to, double weight);
/* Nothing may touch @box; -1 as @owner, or the index of the dot that a leader may start from. */
void          hl_plot_labels_add_block (HlPlotLabels *labels, const HlBox *box, int owner);
/* The best free place; FALSE where there is none.  The place taken is blocked for those that follow. */
gboolean      hl_plot_labels_place     (HlPlotLabels *labels, const HlPlotLabelWish *wish, int owner, HlPlotLabelPlace *place);
/* Takes a placed text out again, to look for a better place now that the others are known. */
void          hl_plot_labels_remove    (HlPlotLabels *labels, const HlPlotLabelPlace *place);
/* What the lines under @box cost; and whether it is free. */
double        hl_plot_labels_cost      (HlPlotLabels *labels, const HlBox *box);
gboolean      hl_plot_labels_is_free   (HlPlotLabels *labels, const HlBox *box);
void          hl_plot_labels_take      (HlPlotLabels *labels, const HlBox *box, HlPlotLabelPlace *place);
gboolean      hl_box_overlaps          (const HlBox *a, const HlBox *b);
gboolean      hl_segment_meets_box     (HlPoint from, HlPoint to, const HlBox *box);
G_DEFINE_AUTOPTR_CLEANUP_FUNC (HlPlotLabels, hl_plot_labels_free)
G_END_DECLS
