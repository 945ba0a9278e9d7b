/* The about window: version, licence, formulation and the caution.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#pragma once
#include <gtk/gtk.h>
G_BEGIN_DECLS

void hl_about_present (GtkWindow *parent);
G_END_DECLS
