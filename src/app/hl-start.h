/* What an empty sheet offers: how to draw, templates, demo plants.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#pragma once
#include <gtk/gtk.h>
G_BEGIN_DECLS
GtkWidget *hl_start_new (void);
G_END_DECLS
