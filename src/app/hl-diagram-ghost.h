/* Another variant as a ghost in the state diagram: which one, and its solution.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#pragma once
#include <gtk/gtk.h>
#include "app/hl-session.h"
G_BEGIN_DECLS

typedef struct _HlDiagramGhost HlDiagramGhost;
/* @changed runs when there is another ghost. */
HlDiagramGhost *hl_diagram_ghost_new      (HlSession *session, void (*changed) (gpointer data), gpointer data);
void            hl_diagram_ghost_free     (HlDiagramGhost *self);
GtkWidget      *hl_diagram_ghost_chooser  (HlDiagramGhost *self);        /* to be placed; hidden where there are no variants */
void            hl_diagram_ghost_update   (HlDiagramGhost *self);        /* after a change of the session */
void            hl_diagram_ghost_choose   (HlDiagramGhost *self, const char *variant);   /* "" the base; NULL: none */
HlSolution     *hl_diagram_ghost_solution (HlDiagramGhost *self);        /* (transfer none) (nullable): none is chosen, or it has no states */
G_END_DECLS
