/* One line that says how things stand; opens the findings and the assumed values.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#pragma once
#include <gtk/gtk.h>
#include "app/hl-session.h"
G_BEGIN_DECLS

#define HL_TYPE_STATUS_STRIP (hl_status_strip_get_type ())
G_DECLARE_FINAL_TYPE (HlStatusStrip, hl_status_strip, HL, STATUS_STRIP, GtkWidget)
GtkWidget *hl_status_strip_new (HlSession *session);
G_END_DECLS
