/* The card of key results.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#pragma once
#include <gtk/gtk.h>
#include "app/hl-session.h"
G_BEGIN_DECLS

#define HL_TYPE_GLANCE (hl_glance_get_type ())
G_DECLARE_FINAL_TYPE (HlGlance, hl_glance, HL, GLANCE, GtkWidget)
GtkWidget *hl_glance_new (HlSession *session);
G_END_DECLS
