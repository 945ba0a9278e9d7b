/* The parts of a layout, for the files that fill them in.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#pragma once
#include "draw/free-space.h"
#include "draw/router.h"
G_BEGIN_DECLS

typedef struct { guint n_points; HlPoint *points; HlGridPoint *grid; } HlShaftLink;   /* points in pixels, led on beneath the symbols; grid: ends at the shaft places */

/* A place for a label and what it costs: @base for where it is, @price with what it covers there. */
typedef enum { HL_FIT_ON_ACROSS, HL_FIT_ON_DOWN, HL_FIT_BESIDE } HlLabelFit;    /* ON: the label interrupts its line, which runs through it once */
typedef struct {
  HlBox      box;
  double     base, price;
  HlLabelFit fit;
  gboolean   has_leader;
  HlPoint    leader[2];
} HlLabelSpot;

struct _HlLayout {
  gatomicrefcount   ref_count;
  HlPlant          *plant;
  guint             n_streams, n_components;
  HlStreamPlace    *streams;
  GArray          **ways;          /* [n_streams] of HlGridPoint */
  HlLabelSpot      *spots;         /* [n_streams] */
  HlComponentPlace *components;
  double           *title_prices;  /* [n_components] what each title's place costs */
  GArray           *shafts;        /* of HlShaftLink */
  HlBox             extents;
  int               left, top, right, bottom;   /* field of the lines [grid units] */
};

/* Looks of the streams: by state, cooling water by where it flows. */
void hl_layout_set_looks  (HlLayout *layout, const HlSolution *solution);
/* Texts and their sizes. */
void hl_layout_set_words  (HlLayout *layout, const HlSolution *solution, const HlTheme *theme);
/* Places of the texts; those of @previous are kept where they still fit. */
void hl_layout_place_words (HlLayout *layout, const HlLayout *previous);
G_END_DECLS
