/* What is remembered between runs: look, window size, pane sizes.  Works without an installed schema too: then nothing is remembered.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#pragma once
#include <gio/gio.h>
G_BEGIN_DECLS
int      hl_settings_get_int    (const char *key, int fallback);
void     hl_settings_set_int    (const char *key, int value);
gboolean hl_settings_get_bool   (const char *key, gboolean fallback);
void     hl_settings_set_bool   (const char *key, gboolean value);
char    *hl_settings_get_string (const char *key, const char *fallback);   /* g_free() */
void     hl_settings_set_string (const char *key, const char *value);

/* Folder that holds the program's data ("examples/..."): HEATLOOM_DATADIR, else the installed one, else beside the sources. */
const char *hl_data_folder      (void);
G_END_DECLS
