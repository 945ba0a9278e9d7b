/* All media compared by a simple cycle, to choose one for a circuit.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#pragma once
#include <gtk/gtk.h>
#include "app/hl-session.h"
G_BEGIN_DECLS

/* @stream: any stream of the circuit.  Returns (transfer none): the window, which closes by itself. */
GtkWidget *hl_media_dialog_present (GtkWindow *parent, HlSession *session, const char *stream);
G_END_DECLS
