/* The strip that components are taken from: dragged onto the canvas, or added by Enter or a double click.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#pragma once
#include <gtk/gtk.h>
G_BEGIN_DECLS
#define HL_TYPE_SHELF (hl_shelf_get_type ())
G_DECLARE_FINAL_TYPE (HlShelf, hl_shelf, HL, SHELF, GtkWidget)
/* A dragged kind travels as the text "heatloom-kind:turbine". */
#define HL_SHELF_DRAG_PREFIX "heatloom-kind:"
GtkWidget *hl_shelf_new (void);
G_END_DECLS
