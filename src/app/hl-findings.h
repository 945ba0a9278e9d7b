/* The list of findings with their mends as buttons.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#pragma once
#include <gtk/gtk.h>
#include "app/hl-session.h"
G_BEGIN_DECLS

#define HL_TYPE_FINDINGS (hl_findings_get_type ())
G_DECLARE_FINAL_TYPE (HlFindings, hl_findings, HL, FINDINGS, GtkWidget)
GtkWidget *hl_findings_new (HlSession *session);
/* For a popover: so wide, and as high as the list is, up to @most pixels. */
void       hl_findings_fit_height (HlFindings *self, int width, int most);
G_END_DECLS
