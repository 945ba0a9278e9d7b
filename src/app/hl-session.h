/* What a window works on: plant and variants with history, solution, selection, file.  Widgets show it and never hold the only copy of anything.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#pragma once
#include <gio/gio.h>
#include "engine/engine.h"
#include "plant/document.h"
G_BEGIN_DECLS

#define HL_TYPE_SESSION (hl_session_get_type ())
G_DECLARE_FINAL_TYPE (HlSession, hl_session, HL, SESSION, GObject)
/* Signals:
 *   "changed"            the plant or its solution is another one (after every edit, undo, redo, open, and another variant in view)
 *   "previewed"          a gesture moved something: the plant is another one, its solution still the former one (components and
 *                        streams keep their indices); only pictures of places need to follow
 *   "selection-changed"
 *   "file-changed"       path, title or dirty flag
 *   "message" (const char *text)   something to say in the status strip: what yielded, what was done
 *   "go-to" (const char *address)  show this place and put the focus there: the nameplate answers for quantities, the canvas for ports */

HlSession        *hl_session_new          (void);
HlPlant          *hl_session_plant        (HlSession *self);      /* (transfer none) never NULL */
HlPlant          *hl_session_base         (HlSession *self);      /* (transfer none) the plant without the preview of a gesture; never NULL */
HlDocument       *hl_session_document     (HlSession *self);      /* (transfer none) base and variants, without the preview; never NULL */
int               hl_session_variant      (HlSession *self);      /* the variant that the plant is; HL_DOCUMENT_BASE */
HlSolution       *hl_session_solution     (HlSession *self);      /* (transfer none) of exactly that plant, but see "previewed"; never NULL */
HlSolution       *hl_session_last_good    (HlSession *self);      /* (transfer none) (nullable): last solved one, to be shown grey while the present one fails */

/* One undoable step named @name (translated: "Move Pump P1").  Takes @plant; settles for @edited (nullable) when @settle; solves at once; emits "changed". */
void              hl_session_apply        (HlSession *self, const char *name, HlPlant *plant, const HlAddress *edited, gboolean settle);
/* The same for a step that makes, changes or takes away variants.  Takes @document; @variant is in view afterwards. */
void              hl_session_apply_document (HlSession *self, const char *name, HlDocument *document, int variant);
/* Looks at a variant or HL_DOCUMENT_BASE: edits go there from now on.  No step: there is nothing to undo. */
void              hl_session_show_variant (HlSession *self, int variant);
/* What the present plant is marked against: what it is compared with, or while a variant is in view the base; NULL: nothing.
 * @name: (out) (optional): of it, translated. */
HlPlant          *hl_session_reference    (HlSession *self, const char **name);
/* Compares with a variant or HL_DOCUMENT_BASE, as it is at any time; with a plant from elsewhere (transfer full), called @name; no more. */
void              hl_session_compare_variant (HlSession *self, int variant);
void              hl_session_compare_plant   (HlSession *self, HlPlant *plant, const char *name);
void              hl_session_compare_end     (HlSession *self);
gboolean          hl_session_is_comparing    (HlSession *self);
/* The same for steps that follow each other closely and have one name, like those of a held arrow key: they become one. */
void              hl_session_apply_again  (HlSession *self, const char *name, HlPlant *plant);
/* The same for a gesture in progress: replaces the plant without a history step until hl_session_apply or hl_session_cancel_preview.
 * Takes @plant.  Emits "changed" where it solves, else "previewed". */
void              hl_session_preview      (HlSession *self, HlPlant *plant, gboolean solve);
void              hl_session_cancel_preview (HlSession *self);
/* Types a value into a quantity: parses, applies, settles.  FALSE with a message to show beside the entry. */
gboolean          hl_session_set_text     (HlSession *self, const HlAddress *address, const char *text, GError **error);
gboolean          hl_session_set_value    (HlSession *self, const HlAddress *address, const HlValue *value, GError **error);   /* NULL value: let go */
gboolean          hl_session_mend         (HlSession *self, const HlMend *mend, GError **error);
void              hl_session_dismiss      (HlSession *self, const HlFinding *finding, gboolean is_dismissed);   /* or restores; one undoable step */

gboolean          hl_session_can_undo     (HlSession *self);
gboolean          hl_session_can_redo     (HlSession *self);
const char       *hl_session_undo_name    (HlSession *self);      /* name of the step, or NULL */
const char       *hl_session_redo_name    (HlSession *self);
void              hl_session_undo         (HlSession *self);
void              hl_session_redo         (HlSession *self);

/* Selection: ids of components and streams of the present plant. */
const char *const *hl_session_selection   (HlSession *self, guint *n);    /* (transfer none) interned ids */
gboolean          hl_session_is_selected  (HlSession *self, const char *id);
void              hl_session_select       (HlSession *self, const char *id, gboolean extend);   /* NULL id: nothing */
void              hl_session_select_many  (HlSession *self, const char *const *ids, guint n);
/* Selects the owner of @address (a component, a stream; nothing for the plant) and emits "go-to" with the address as text. */
void              hl_session_go_to        (HlSession *self, const HlAddress *address);

gboolean          hl_session_open         (HlSession *self, const char *path, GError **error);
gboolean          hl_session_save         (HlSession *self, const char *path, GError **error);  /* NULL path: its own */
gboolean          hl_session_revert       (HlSession *self, GError **error);    /* one undoable step: what its file holds now */
void              hl_session_reset        (HlSession *self, HlPlant *plant, const char *path);  /* (transfer full plant) fresh history */
void              hl_session_reset_document (HlSession *self, HlDocument *document, const char *path);   /* (transfer full document) */
const char       *hl_session_path         (HlSession *self);      /* NULL: never saved */
gboolean          hl_session_is_dirty     (HlSession *self);
char             *hl_session_display_name (HlSession *self);      /* title or file name; g_free() */
G_END_DECLS
