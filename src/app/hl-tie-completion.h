/* Addresses offered while a tie is typed: those that match, with their present values.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#pragma once
#include <gtk/gtk.h>
#include "app/hl-session.h"
G_BEGIN_DECLS

/* The piece of an address in which the cursor of "=0.23*B1.st" stands [characters]; FALSE: none can stand there. */
gboolean   hl_tie_word       (const char *text, int cursor, int *start, int *end);
typedef struct { HlAddress address; char *text, *value; } HlTieMatch;     /* "B1.steam.p", "65.00 bar" or "" */
/* Quantities of one dimension whose address or name holds @word, those whose address begins with it first; without @own. */
GPtrArray *hl_tie_matches    (const HlSolution *solution, const HlAddress *own, const char *word);

/* The list under an entry; it belongs to @owner, which unparents it in dispose. */
#define HL_TYPE_TIE_COMPLETION (hl_tie_completion_get_type ())
G_DECLARE_FINAL_TYPE (HlTieCompletion, hl_tie_completion, HL, TIE_COMPLETION, GObject)
HlTieCompletion *hl_tie_completion_new  (GtkWidget *owner, GtkWidget *entry, HlSession *session, const HlAddress *own);
/* Follows text and cursor of the entry. */
void             hl_tie_completion_update (HlTieCompletion *self);
void             hl_tie_completion_close  (HlTieCompletion *self);
/* Down and Up choose, Return takes what is chosen, Tab that or the first, Escape closes; FALSE: not its key. */
gboolean         hl_tie_completion_key    (HlTieCompletion *self, guint key);
G_END_DECLS
