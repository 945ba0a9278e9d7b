/* What lies where on the canvas, for finding room for words.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#pragma once
#include "draw/layout.h"
G_BEGIN_DECLS

/* Sizes of labels and titles, shared by whoever measures and whoever draws. */
#define HL_LABEL_HEIGHT      28.0
#define HL_LABEL_RING        9.0      /* radius of the numbered ring */
#define HL_LABEL_TEXT_LEFT   35.0     /* where the words begin */
#define HL_LABEL_TEXT_RIGHT  11.0     /* room after them */
#define HL_LABEL_FLOW_SIZE   10.5
#define HL_LABEL_STATE_SIZE  9.5
#define HL_TITLE_SIZE        11.0
#define HL_TITLE_FIGURE_SIZE 10.0
#define HL_TITLE_LINE        13.5     /* line height */

typedef struct _HlFreeSpace HlFreeSpace;
HlFreeSpace *hl_free_space_new      (int left, int top, int right, int bottom);     /* grid units, all that follows lies within */
void         hl_free_space_free     (HlFreeSpace *space);
void         hl_free_space_add_box  (HlFreeSpace *space, int left, int top, int right, int bottom);
void         hl_free_space_add_line (HlFreeSpace *space, const HlGridPoint *points, guint n_points);
void         hl_free_space_close    (HlFreeSpace *space);      /* after the last box and line, before the first question */
int          hl_free_space_boxes    (const HlFreeSpace *space, const HlBox *box, double margin);   /* grid points of symbols inside */
int          hl_free_space_lines    (const HlFreeSpace *space, const HlBox *box, double margin);   /* grid points of lines inside */
int          hl_count_line_points   (const HlGridPoint *points, guint n_points, const HlBox *box, double margin);  /* of one line, counted alike */

/* Words already placed.  @id tells them apart and takes them away again. */
void         hl_free_space_take     (HlFreeSpace *space, int id, const HlBox *box);
void         hl_free_space_give_back (HlFreeSpace *space, int id, const HlBox *box);
double       hl_free_space_taken    (const HlFreeSpace *space, const HlBox *box, double margin);   /* overlapped area [px2] */
G_DEFINE_AUTOPTR_CLEANUP_FUNC (HlFreeSpace, hl_free_space_free)
G_END_DECLS
