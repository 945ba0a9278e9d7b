/* What the files of the canvas share.  "View" pixels are the widget's, "canvas" pixels those of the drawing at zoom 1.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#pragma once
#include "app/hl-canvas.h"
#include "app/hl-component-item.h"
#include "draw/canvas-picture.h"
#include "draw/marks.h"
G_BEGIN_DECLS

typedef enum {
  MODE_NONE,
  MODE_PRESS_COMPONENT,    /* pressed, not yet moved */
  MODE_MOVE,
  MODE_PRESS_LABEL,
  MODE_LABEL,
  MODE_PRESS_GROUND,
  MODE_RUBBER,
  MODE_PRESS_STREAM,
  MODE_BEND,
  MODE_CONNECT,
  MODE_SHAFT,
  MODE_PAN,
} HlCanvasMode;

/* A port: interned words, no ownership. */
typedef struct { const char *id, *port; } HlPortRef;

/* A drawing kept while nothing that it shows has changed. */
typedef struct {
  GByteArray    *key;
  GskRenderNode *node;
} HlKeptNode;

struct _HlCanvas {
  GtkWidget   parent_instance;
  HlSession  *session;
  double      zoom, ox, oy;          /* view = o + zoom * canvas */
  gboolean    is_fitted;             /* the whole plant stays in view when the size changes */
  int         fit_width, fit_height; /* the size that it was last fitted to */
  HlLayout   *layout;
  const HlTheme *theme;              /* that the layout was measured with */
  HlSolution *shown;                 /* the solution whose figures stand in the labels */
  gboolean    is_stale;
  GHashTable *items;                 /* id -> HlComponentItem */
  GArray     *lines, *labels, *titles, *shafts;   /* HlKeptNode, in plant order */
  HlKeptNode  dots;                  /* the dotted ground */
  HlMarks    *marks;                 /* of what differs from the reference; NULL: there is none */
  HlPlant    *marked_reference, *marked_plant;
  gboolean    has_ghosts;            /* a comparison: what is gone is shown too */
  HlLayout   *ghosts;                /* of the reference, for what is gone; or NULL */

  /* gesture in progress */
  HlCanvasMode mode;
  double      start_x, start_y;      /* view */
  double      last_x, last_y;
  double      start_ox, start_oy;
  HlPlant    *base;                  /* the plant before a move */
  const char *grabbed;               /* component or stream under the press */
  gboolean    was_selected;
  int         grid_dx, grid_dy;
  GArray     *bend_way;              /* HlPoint: the line before a bend */
  guint       bend_segment;
  const char *replugged;             /* stream whose end is being moved to another port, or NULL */
  HlPortRef   from;                  /* of a line or (port NULL) a shaft being drawn */
  GArray     *targets;               /* HlPortRef that the line may end at */
  HlPortRef   target;                /* the one under the pointer */
  int         branch;                /* index of the stream under the pointer that the line would end in, or -1 */
  int         branch_x, branch_y, branch_turn;

  const char *hovered;               /* component under the pointer */
  HlPortRef   hot;                   /* port under the pointer */
  gboolean    is_space_down;
  const HlKind *drop_kind;           /* dragged from the shelf over the canvas */
  int         drop_x, drop_y, drop_turn;
  int         drop_stream;           /* index of the stream it would be inserted into, or -1 */
  GtkWidget  *popover;               /* context menu or list of ports */
  guint       trace_source;
};

/* hl-canvas.c */
void     hl_canvas_to_canvas   (HlCanvas *self, double vx, double vy, double *x, double *y);
void     hl_canvas_to_view     (HlCanvas *self, double x, double y, double *vx, double *vy);
void     hl_canvas_to_grid     (HlCanvas *self, double vx, double vy, int *gx, int *gy);
void     hl_canvas_zoom_at     (HlCanvas *self, double zoom, double vx, double vy);
void     hl_canvas_pan_to      (HlCanvas *self, double ox, double oy);
HlComponentItem *hl_canvas_item (HlCanvas *self, const char *id);
const char *hl_canvas_component_at (HlCanvas *self, double vx, double vy);
HlPlant *hl_canvas_plant       (HlCanvas *self);
void     hl_canvas_set_popover (HlCanvas *self, GtkWidget *popover, double vx, double vy);    /* shows it, ends the former one */
void     hl_canvas_say         (HlCanvas *self, const char *text);                            /* in the status strip */

/* hl-canvas-draw.c */
void     hl_kept_node_clear    (gpointer kept);
void     hl_canvas_renew_nodes (HlCanvas *self);
void     hl_canvas_draw        (HlCanvas *self, GtkSnapshot *snapshot);

/* hl-canvas-marks.c */
void     hl_canvas_update_marks (HlCanvas *self);
void     hl_canvas_forget_marks (HlCanvas *self);
void     hl_canvas_draw_ghosts  (HlCanvas *self, GtkSnapshot *snapshot);
void     hl_canvas_draw_badges  (HlCanvas *self, GtkSnapshot *snapshot);
const char *hl_canvas_mark_words (HlCanvas *self, const char *id);                            /* "changed"; NULL: no mark */

/* hl-canvas-gestures.c */
void     hl_canvas_add_gestures (HlCanvas *self);
int      hl_canvas_label_at     (HlCanvas *self, double vx, double vy);                       /* index of the stream; -1: none */

/* hl-canvas-drop.c, hl-canvas-menu.c */
void     hl_canvas_add_drop_target (HlCanvas *self);
void     hl_canvas_put          (HlCanvas *self, const HlKind *kind, double vx, double vy);   /* a new component there, into a line where one runs */
void     hl_canvas_add_menu     (HlCanvas *self);
void     hl_canvas_add_quick_add (HlCanvas *self);                                            /* hl-canvas-quick-add.c */

int      hl_canvas_stream_at   (HlCanvas *self, double vx, double vy);                        /* line or label; -1: none */
guint    hl_canvas_segment_at  (const HlStreamPlace *place, double x, double y, HlPoint *on_it);   /* canvas: the nearest segment, and the point of it nearest by */
int      hl_canvas_snap_to_line (const HlStreamPlace *place, int *gx, int *gy);               /* onto its nearest segment; which way that runs: 0 right, 1 down ... */

/* hl-canvas-stream.c */
void     hl_canvas_begin_bend  (HlCanvas *self);                                              /* of the line grabbed */
void     hl_canvas_update_bend (HlCanvas *self, double dx, double dy);
void     hl_canvas_end_bend    (HlCanvas *self, double dx, double dy);
gboolean hl_canvas_line_end_at (HlCanvas *self, double vx, double vy, const char **stream, HlPortRef *other);  /* @other: the port that stays */
char    *hl_canvas_describe_stream (HlCanvas *self, guint stream);                            /* all that is known of it, in lines; g_free() */

/* hl-canvas-connect.c */
gboolean hl_canvas_port_at     (HlCanvas *self, double vx, double vy, HlPortRef *port);       /* a free port */
gboolean hl_canvas_shaft_end_at (HlCanvas *self, double vx, double vy, const char **id);
gboolean hl_canvas_shaft_end   (const HlPlant *plant, const HlComponent *component, int end, double *x, double *y);  /* canvas; FALSE: not to be grabbed */
gboolean hl_canvas_port_point  (HlCanvas *self, const HlPortRef *port, double *x, double *y); /* canvas */
void     hl_canvas_begin_line  (HlCanvas *self, const HlPortRef *from);
void     hl_canvas_begin_replug (HlCanvas *self, const char *stream, const HlPortRef *stays);
void     hl_canvas_update_line (HlCanvas *self, double vx, double vy);
void     hl_canvas_end_line    (HlCanvas *self);                                              /* connects where a target is under the pointer */
void     hl_canvas_drop_line   (HlCanvas *self);                                              /* forgets it */
gboolean hl_canvas_port_is_free (const HlPlant *plant, const HlPortRef *port);
G_END_DECLS
