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

/* Prices.  Covering a symbol or other words is what must not happen, covering a foreign line what should not. */
#define PRICE_SYMBOL   2000.0    /* a grid point of a symbol */
#define PRICE_WORDS    40.0      /* a pixel squared of other words */
#define PRICE_LINE     110.0     /* a grid point of a foreign line */
#define PRICE_STRUCK   350.0     /* a grid point of a line that runs through a title, which has no ground of its own */
#define PRICE_OWN_LINE 14.0      /* a grid point of the own line that is not simply passed through */
#define KEPT           25.0      /* what a label gains by staying where it was */
#define TROUBLE        62.0      /* dearer: nowhere at its line without covering something; about the cheapest place with a leader */
#define NEAR_BY        60.0      /* pixels within which words may have to make room for a label */
#define LONGEST_LEADER 160.0     /* pixels */
#define CARE           240       /* labels placed anew at most for the sake of those that cover something */
#define COVERING       200.0     /* dearer: covers something */
#define SYMBOL_MARGIN  4.0
#define LINE_MARGIN    4.0
#define WORDS_MARGIN   3.0
#define GAP            6.0       /* between a line and a label beside it, a symbol and its title */

/* One label: searched, or as it was before where that still serves; then it counts as taken. */
typedef void (*HlTakeFunc) (HlFreeSpace *space, int id, const HlBox *box);
void     hl_layout_place_label  (HlLayout *layout, HlFreeSpace *space, guint n, const HlBox *kept);
gboolean hl_layout_keep_label   (HlLayout *layout, HlFreeSpace *space, guint n, const HlLayout *previous, guint before);
void     hl_layout_settle_label (HlLayout *layout, HlFreeSpace *space, guint n, const HlLabelSpot *spot);
void     hl_layout_take_label   (const HlLayout *layout, HlFreeSpace *space, guint n, HlTakeFunc act);   /* with its leader: taken, or given back */
G_END_DECLS
