/* The program: command line, look, shortcuts, windows.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#pragma once
#include <gtk/gtk.h>
G_BEGIN_DECLS
#define HL_TYPE_APPLICATION (hl_application_get_type ())
G_DECLARE_FINAL_TYPE (HlApplication, hl_application, HL, APPLICATION, GtkApplication)
HlApplication *hl_application_new (GApplicationFlags flags);

/* Before gtk_init(): locale, translations, and a renderer that suits a machine without a GPU, unless the user chose one. */
void           hl_application_prepare_process (void);
G_END_DECLS
