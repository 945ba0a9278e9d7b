/* The live state diagram: read-out under the pointer, a click selects the stream of a state.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#pragma once
#include <gtk/gtk.h>
#include "app/hl-session.h"
#include "draw/state-diagram.h"
G_BEGIN_DECLS

#define HL_TYPE_DIAGRAM_VIEW (hl_diagram_view_get_type ())
G_DECLARE_FINAL_TYPE (HlDiagramView, hl_diagram_view, HL, DIAGRAM_VIEW, GtkWidget)
GtkWidget *hl_diagram_view_new      (HlSession *session);
/* T-s, h-s or p-h, as the chooser in the corner does. */
void       hl_diagram_view_set_kind (HlDiagramView *self, HlStateDiagramKind kind);
/* A variant drawn pale beneath the present plant: its name, "" the base, NULL none. */
void       hl_diagram_view_set_ghost (HlDiagramView *self, const char *variant);
G_END_DECLS
