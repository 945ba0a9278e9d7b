/* Finds orthogonal ways for lines round boxes and beside one another, on the grid of the canvas.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#pragma once
#include "draw/symbols.h"
G_BEGIN_DECLS

typedef struct _HlRouter HlRouter;
typedef struct {
  int      x, y;
  HlSide   side;         /* where the line leaves, or where it comes in from */
  gboolean any_side;     /* a loose end: @side does not count */
} HlRouteEnd;

/* A field of cells with corners included; larger fields than HL_ROUTER_MOST_CELLS give NULL. */
#define HL_ROUTER_MOST_CELLS 4000000
HlRouter *hl_router_new         (int left, int top, int right, int bottom);
void      hl_router_free        (HlRouter *router);
void      hl_router_add_box     (HlRouter *router, int left, int top, int right, int bottom);   /* nothing passes; its surroundings cost */
void      hl_router_add_line    (HlRouter *router, const HlGridPoint *points, guint n_points);   /* others keep off it */
void      hl_router_remove_line (HlRouter *router, const HlGridPoint *points, guint n_points);
/* Does a line cross a box, the ways out of the boxes at its ends aside? */
gboolean  hl_router_is_blocked  (HlRouter *router, const HlGridPoint *points, guint n_points, const HlRouteEnd *from, const HlRouteEnd *to);

/* The cheapest way by length, bends, crossings and closeness, through the bends @via.  Appends HlGridPoint corners to
 * @way, ends included.  FALSE where there is none; then @way holds a plain one that minds no box. */
gboolean  hl_router_find        (HlRouter *router, const HlRouteEnd *from, const HlRouteEnd *to,
                                 const HlGridPoint *via, guint n_via, GArray *way);
/* Moves inner segments of a way, not added now, to the best place between its neighbours: the middle where all else is equal. */
void      hl_router_settle      (HlRouter *router, GArray *way);
/* A way without a field: at most three bends, minds no box. */
void      hl_router_plain_way   (const HlRouteEnd *from, const HlRouteEnd *to, GArray *way);
G_DEFINE_AUTOPTR_CLEANUP_FUNC (HlRouter, hl_router_free)
G_END_DECLS
