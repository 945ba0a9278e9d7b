/* What the canvas can do to a plant, as functions from plant to plant: add, move, turn, connect ...
 * SPDX-License-Identifier: GPL-3.0-or-later */
#pragma once
#include "plant/plant.h"
G_BEGIN_DECLS

/* Each returns a new plant (transfer full); NULL with @error where it cannot be done. */
HlPlant *hl_edit_add         (const HlPlant *plant, const HlKind *kind, int x, int y, const char **id);   /* @id: (out) interned */
HlPlant *hl_edit_move        (const HlPlant *plant, const char *const *ids, guint n, int dx, int dy);
HlPlant *hl_edit_turn        (const HlPlant *plant, const char *const *ids, guint n);    /* a quarter clockwise, several about their middle */
HlPlant *hl_edit_mirror      (const HlPlant *plant, const char *const *ids, guint n);    /* left-right as seen */
HlPlant *hl_edit_delete      (const HlPlant *plant, const char *const *ids, guint n);
/* Copies of the components with the lines and shafts among them. @copies gets the interned ids of the new components. */
HlPlant *hl_edit_duplicate   (const HlPlant *plant, const char *const *ids, guint n, int dx, int dy, GPtrArray *copies);
/* The selected components alone, with the lines and shafts among them: what is put on the clipboard. */
HlPlant *hl_edit_extract     (const HlPlant *plant, const char *const *ids, guint n);
/* Everything of @other added to @plant. */
HlPlant *hl_edit_merge       (const HlPlant *plant, const HlPlant *other, int dx, int dy, GPtrArray *copies);
/* A line between two ports, whichever of them is the outlet. */
HlPlant *hl_edit_connect     (const HlPlant *plant, const char *a_id, const char *a_port, const char *b_id, const char *b_port,
                              const char **stream, GError **error);
HlPlant *hl_edit_join_shaft  (const HlPlant *plant, const char *a_id, const char *b_id, GError **error);
HlPlant *hl_edit_leave_shaft (const HlPlant *plant, const char *id, GError **error);
/* Into a line, at (x, y) on it, turned by @turn quarters where the line runs right (0), down, left or up there. */
HlPlant *hl_edit_insert      (const HlPlant *plant, const char *stream, const HlKind *kind, int x, int y, int turn, const char **id, GError **error);
/* A line from a port to the middle of a line: a splitter where the port is an inlet, a mixer where it is an outlet. */
HlPlant *hl_edit_branch      (const HlPlant *plant, const char *a_id, const char *a_port, const char *stream, int x, int y, int turn,
                              const char **id, GError **error);
/* Bends of a line in their order from its outlet; none: it finds its way. */
HlPlant *hl_edit_route       (const HlPlant *plant, const char *stream, const HlGridPoint *bends, guint n);
/* The end of a line that is an outlet or inlet as @port is, to that port; the line keeps its number and values. */
HlPlant *hl_edit_replug      (const HlPlant *plant, const char *stream, const char *id, const char *port, GError **error);
HlPlant *hl_edit_place_label (const HlPlant *plant, const char *stream, gboolean has_place, int x, int y);

/* Components lined up at an edge or the middle of the box around them: left, centre, right move them across, the others down. */
typedef enum { HL_ALIGN_LEFT, HL_ALIGN_CENTRE, HL_ALIGN_RIGHT, HL_ALIGN_TOP, HL_ALIGN_MIDDLE, HL_ALIGN_BOTTOM } HlAlignment;
HlPlant *hl_edit_align       (const HlPlant *plant, const char *const *ids, guint n, HlAlignment alignment);
/* The middles of three or more evenly spaced between the outermost two, which stay. */
HlPlant *hl_edit_distribute  (const HlPlant *plant, const char *const *ids, guint n, gboolean is_across);

/* Whether a line may run between two ports, and if not why. */
gboolean hl_edit_can_connect (const HlPlant *plant, const char *a_id, const char *a_port, const char *b_id, const char *b_port, GError **error);
gboolean hl_edit_can_join    (const HlPlant *plant, const char *a_id, const char *b_id, GError **error);
gboolean hl_edit_can_insert  (const HlKind *kind);
/* The free place nearest to (x, y) for a component of @kind. */
void     hl_edit_free_place  (const HlPlant *plant, const HlKind *kind, int *x, int *y);
/* "P1", "P1 and T1", "3 items": for names of steps. g_free(). */
char    *hl_edit_words       (const HlPlant *plant, const char *const *ids, guint n);
G_END_DECLS
