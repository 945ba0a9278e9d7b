/* Rows of the nameplate that choose a medium: that of a circuit, and how water is calculated.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#pragma once
#include <gtk/gtk.h>
#include "app/hl-session.h"
G_BEGIN_DECLS

/* The medium of the circuit of a stream; a press opens the comparison of all media. */
GtkWidget *hl_medium_row_new      (HlSession *session);
void       hl_medium_row_set      (GtkWidget *row, const char *name, const char *stream);
GtkWidget *hl_formulation_row_new    (HlSession *session);
void       hl_formulation_row_update (GtkWidget *row);
/* One undoable step: the whole circuit of @stream on @medium.  FALSE with an error where that cannot be. */
gboolean   hl_medium_apply        (HlSession *session, const char *stream, const char *medium, GError **error);
G_END_DECLS
