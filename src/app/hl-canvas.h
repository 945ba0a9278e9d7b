/* The drawing surface: components as child widgets, streams drawn beneath them.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#pragma once
#include <gtk/gtk.h>
#include "app/hl-session.h"
G_BEGIN_DECLS
#define HL_TYPE_CANVAS (hl_canvas_get_type ())
G_DECLARE_FINAL_TYPE (HlCanvas, hl_canvas, HL, CANVAS, GtkWidget)
/* Property "zoom" (double). */
GtkWidget *hl_canvas_new            (HlSession *session);
double     hl_canvas_get_zoom       (HlCanvas *self);
void       hl_canvas_zoom_by        (HlCanvas *self, double factor);          /* about the middle of the view */
void       hl_canvas_fit            (HlCanvas *self);                         /* shows the whole plant, now or as soon as there is a size */
void       hl_canvas_middle         (HlCanvas *self, int *x, int *y);         /* of the view, in grid units */
void       hl_canvas_reveal         (HlCanvas *self, const char *id);         /* scrolls so far that the component is seen */
void       hl_canvas_ask_connection (HlCanvas *self, const char *id);         /* list of ports to connect, by keyboard */
void       hl_canvas_quick_add      (HlCanvas *self);                         /* asks for a kind by its name, for the place under the pointer */
void       hl_canvas_drop_through   (HlCanvas *self, GtkWidget *cover);       /* what is dropped on @cover, which lies over the canvas, lands on it */
gboolean   hl_canvas_cancel         (HlCanvas *self);                         /* ends a gesture in progress; FALSE: there was none */
/* Where a component or one of its ports lies in the widget, for tests that point there. */
gboolean   hl_canvas_locate         (HlCanvas *self, const char *id, const char *port, double *x, double *y);
G_END_DECLS
