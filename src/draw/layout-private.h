/* The parts of a layout, for the files that fill them in.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#pragma once
#include "draw/free-space.h"
#include "draw/router.h"
G_BEGIN_DECLS

typedef struct { guint n_points; HlPoint *points; HlGridPoint *grid; } HlShaftLink;   /* points in pixels, led on beneath the symbols; grid: ends at the shaft places */

struct _HlLayout {
  gatomicrefcount   ref_count;
  HlPlant          *plant;
  guint             n_streams, n_components;
  HlStreamPlace    *streams;
  GArray          **ways;          /* [n_streams] of HlGridPoint */
  HlComponentPlace *components;
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
