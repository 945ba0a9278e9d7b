/* One quantity of several components at once: what is typed is given to all of them.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#pragma once
#include <gtk/gtk.h>
#include "app/hl-session.h"
G_BEGIN_DECLS

/* Gives what @text says to the quantity @key of all these components, as one step; an empty text lets it go. */
gboolean   hl_shared_set_text (HlSession *session, const char *const *ids, guint n_ids, const char *key, const char *text, GError **error);

#define HL_TYPE_SHARED_ROW (hl_shared_row_get_type ())
G_DECLARE_FINAL_TYPE (HlSharedRow, hl_shared_row, HL, SHARED_ROW, GtkWidget)
GtkWidget *hl_shared_row_new    (HlSession *session, const char *key, const char *name);
/* Shows the value of the components selected at present; text that is being typed stays. */
void       hl_shared_row_update (HlSharedRow *self);
/* About to be removed: commits nothing any more. */
void       hl_shared_row_retire (HlSharedRow *self);
G_END_DECLS
