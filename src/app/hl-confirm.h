/* A question with buttons over a window.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#pragma once
#include <gtk/gtk.h>
G_BEGIN_DECLS

/* @buttons: NULL-terminated, the last one answers to Return.  @done gets the index of the button, or -1 for Escape and the
 * window's own close button; it runs exactly once. */
void hl_confirm (GtkWindow *parent, const char *title, const char *body, const char *const *buttons,
                 void (*done) (int button, gpointer data), gpointer data);
G_END_DECLS
