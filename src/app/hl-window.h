/* The main window: header bar, shelf, canvas, nameplate, status strip, diagram area.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#pragma once
#include <gtk/gtk.h>
#include "app/hl-session.h"
G_BEGIN_DECLS
#define HL_TYPE_WINDOW (hl_window_get_type ())
G_DECLARE_FINAL_TYPE (HlWindow, hl_window, HL, WINDOW, GtkApplicationWindow)
HlWindow  *hl_window_new       (GtkApplication *application, HlSession *session);    /* NULL session: an empty plant */
HlSession *hl_window_session   (HlWindow *self);                 /* (transfer none) */
/* At once, without a question; an error is shown in the window. */
gboolean   hl_window_open_path (HlWindow *self, const char *path);
/* A demo plant: opened as a new plant without a file, so that saving asks for a place. */
gboolean   hl_window_open_demo (HlWindow *self, const char *path);
/* An empty plant in the unit set that was chosen last. */
HlPlant   *hl_window_new_plant (void);
/* Says over a demo plant what to do with it, until told not to. */
void       hl_window_show_demo_hint (HlWindow *self);
/* Asks whether to take up work on this plant that a crash has left behind, if there is any. */
void       hl_window_offer_recovery (HlWindow *self);
G_END_DECLS
