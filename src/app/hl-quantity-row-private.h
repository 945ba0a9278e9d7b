/* Parts of a quantity's row that only its own files need.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#pragma once
#include "app/hl-quantity-row.h"
#include "app/hl-pane.h"
#include "app/hl-scrub.h"
#include "app/hl-tie-completion.h"
G_BEGIN_DECLS

struct _HlQuantityRow {
  GtkWidget      parent_instance;
  HlSession     *session;
  HlAddress      address;
  char          *name;
  const HlQuantityKind *kind;
  int            number;         /* of a repeated quantity, from 1; else 0 */

  GtkWidget     *line;           /* name, entry, unit, origin */
  GtkWidget     *name_button, *name_label, *entry, *unit, *origin_button, *pill;
  GtkWidget     *note;           /* error or hint under the line */
  GtkWidget     *explanation;    /* box */
  GtkWidget     *explain_lines, *explain_help;
  GSimpleActionGroup *actions;
  GSimpleAction *origin_action;

  char          *described;      /* to assistive programs: "65.00 bar, assumed" */
  char          *shown;          /* the text last put into the entry: anything else has been typed */
  gboolean       is_focused;
  HlTieCompletion *completion;   /* addresses offered while a tie is typed */
  HlScrub       *scrub;          /* while the value is being dragged */
  double         drag_x, drag_amount;   /* last place of the pointer; what the value has moved [units shown] */
  gboolean       is_drag_over;   /* this drag has nothing to move, or not any more */
  gboolean       is_retired;     /* about to be removed: commits nothing any more */
};

/* Where the value lives: the address itself, or the stream's or other port's address that names the same state. */
HlAddress      hl_quantity_row_carrier (HlQuantityRow *self);
const HlValue *hl_quantity_row_value   (HlQuantityRow *self);                /* NULL: found */
gboolean       hl_quantity_row_number  (HlQuantityRow *self, double *si);    /* as given or solved; FALSE unknown */
void           hl_quantity_row_set_note (HlQuantityRow *self, const char *text, gboolean is_error);   /* NULL: none */
void           hl_quantity_row_start_typing (HlQuantityRow *self, const char *text);
gboolean       hl_quantity_row_is_typing (HlQuantityRow *self);
/* Tries what has been typed; FALSE where it cannot be taken: it stays, with what is wrong under it. */
gboolean       hl_quantity_row_commit (HlQuantityRow *self);
/* hl-quantity-row-scrub.c */
void           hl_quantity_row_add_scrub    (HlQuantityRow *self);
void           hl_quantity_row_update_scrub (HlQuantityRow *self);
gboolean       hl_quantity_row_can_scrub    (HlQuantityRow *self);
/* hl-quantity-row-origin.c */
void           hl_quantity_row_add_origin    (HlQuantityRow *self);
void           hl_quantity_row_update_origin (HlQuantityRow *self);
/* hl-quantity-row-variant.c */
void           hl_quantity_row_add_variant_action (HlQuantityRow *self);
void           hl_quantity_row_update_variant     (HlQuantityRow *self);
void           hl_quantity_row_append_way_back    (HlQuantityRow *self, GMenu *menu);
char          *hl_quantity_row_difference         (HlQuantityRow *self);     /* "Base: 0.07 bar, given"; NULL: none.  g_free() */
/* hl-quantity-row-explain.c */
void           hl_quantity_row_add_explanation    (HlQuantityRow *self);
void           hl_quantity_row_update_explanation (HlQuantityRow *self);
char          *hl_quantity_row_help               (HlQuantityRow *self, const char *line_break);
G_END_DECLS
