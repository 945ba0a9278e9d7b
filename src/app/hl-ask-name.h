/* Asks for a name in a small window.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#pragma once
#include <gtk/gtk.h>
G_BEGIN_DECLS

/* @check says whether the name would do, and if not why; the window stays until it does, or until Escape.  @done gets the name;
 * it runs at most once.  @free_data (nullable) runs when the window goes. */
typedef gboolean (*HlCheckName) (const char *name, gpointer data, GError **error);
typedef void     (*HlNameGiven) (const char *name, gpointer data);
void hl_ask_name (GtkWindow *parent, const char *title, const char *accept, const char *proposal,
                  HlCheckName check, HlNameGiven done, gpointer data, GDestroyNotify free_data);
G_END_DECLS
