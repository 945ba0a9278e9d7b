/* The button in the state diagram that switches what it shows beside the cycle.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#pragma once
#include <gtk/gtk.h>
G_BEGIN_DECLS

/* @changed is called with @data whenever a switch moves. */
GtkWidget *hl_diagram_extras_button_new   (void (*changed) (gpointer data), gpointer data);
guint      hl_diagram_extras_button_flags (GtkWidget *button);      /* HlDiagramExtras */
G_END_DECLS
