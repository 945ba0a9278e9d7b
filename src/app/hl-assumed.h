/* The list of assumed values: what nobody has confirmed yet, with its source.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#pragma once
#include <gtk/gtk.h>
#include "app/hl-session.h"
G_BEGIN_DECLS

#define HL_TYPE_ASSUMED (hl_assumed_get_type ())
G_DECLARE_FINAL_TYPE (HlAssumed, hl_assumed, HL, ASSUMED, GtkWidget)
GtkWidget *hl_assumed_new (HlSession *session);
G_END_DECLS
