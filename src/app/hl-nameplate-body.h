/* Groups of rows that are changed in place: what stays keeps its widget, and with it the focus.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#pragma once
#include <gtk/gtk.h>
G_BEGIN_DECLS

#define HL_TYPE_NAMEPLATE_BODY (hl_nameplate_body_get_type ())
G_DECLARE_FINAL_TYPE (HlNameplateBody, hl_nameplate_body, HL, NAMEPLATE_BODY, GtkWidget)
GtkWidget *hl_nameplate_body_new   (void);

/* Between begin and end every row is asked for by its key, in order; what is not put again goes. */
void       hl_nameplate_body_begin (HlNameplateBody *self);
GtkWidget *hl_nameplate_body_find  (HlNameplateBody *self, const char *key);     /* NULL: make one and put it */
void       hl_nameplate_body_put   (HlNameplateBody *self, const char *heading, const char *key, GtkWidget *row);
void       hl_nameplate_body_end   (HlNameplateBody *self);
void       hl_nameplate_body_clear (HlNameplateBody *self);
void       hl_nameplate_body_foreach (HlNameplateBody *self, void (*func) (GtkWidget *row, gpointer data), gpointer data);
G_END_DECLS
