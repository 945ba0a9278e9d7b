/* The given value behind a state: which ones move it, and dragging the state by one of them.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#pragma once
#include "app/hl-scrub.h"
#include "draw/state-diagram.h"
G_BEGIN_DECLS

/* A given or assumed value near a state, and what a small change of it does there. */
typedef struct {
  HlAddress address;        /* where the value lives */
  double    value, delta;   /* [SI] */
  HlState   before, after;  /* of the stream, with value and with value + delta */
  gboolean  is_state;       /* p, T or x: goes before losses and efficiencies */
} HlLever;

/* Those of the stream and of the components at its ends that move its state; element-type HlLever, never NULL. */
GArray        *hl_levers_new    (HlSolution *solution, guint stream);
/* The one that moves the state farthest along the direction [pixels] in the diagram; NULL: none does. */
const HlLever *hl_levers_along  (const GArray *levers, const HlStateDiagram *diagram, HlStateDiagramKind kind, double dx, double dy);

/* Dragging: from begin to finish or cancel, which free it.  The pixels are those of @diagram, which must outlive the drag. */
typedef struct _HlLeverDrag HlLeverDrag;
HlLeverDrag   *hl_lever_drag_begin  (HlSession *session, const HlLever *lever, const char *stream_id, const HlStateDiagram *diagram,
                                     HlStateDiagramKind kind);
/* Brings the state as near as the value can to so many pixels from where it was, by values with which the plant still solves. */
void           hl_lever_drag_to     (HlLeverDrag *drag, double dx, double dy);
char          *hl_lever_drag_text   (HlLeverDrag *drag);      /* "exhaust pressure of T1: 0.07 bar → 0.09 bar"; g_free() */
void           hl_lever_drag_finish (HlLeverDrag *drag);
void           hl_lever_drag_cancel (HlLeverDrag *drag);
G_END_DECLS
