/* The side pane that shows and edits the selection, or the plant where nothing is selected.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#pragma once
#include <gtk/gtk.h>
#include "app/hl-session.h"
G_BEGIN_DECLS

#define HL_TYPE_NAMEPLATE (hl_nameplate_get_type ())
G_DECLARE_FINAL_TYPE (HlNameplate, hl_nameplate, HL, NAMEPLATE, GtkWidget)
GtkWidget *hl_nameplate_new (HlSession *session);
/* Puts the focus into the row of @address where the present selection shows it. */
gboolean   hl_nameplate_focus (HlNameplate *self, const HlAddress *address);
G_END_DECLS
