/* Writes JSON with numbers that read back to the same value.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#pragma once
#include <glib.h>
G_BEGIN_DECLS

/* Every call inside an object names its member; inside an array the name is NULL. */
typedef struct _HlJsonText HlJsonText;
HlJsonText *hl_json_text_new     (void);
/* @is_flat: everything inside stands on one line. */
void        hl_json_text_begin   (HlJsonText *self, const char *name, char bracket, gboolean is_flat);   /* '{' or '[' */
void        hl_json_text_end     (HlJsonText *self);
void        hl_json_text_number  (HlJsonText *self, const char *name, double value);                     /* null unless finite */
void        hl_json_text_string  (HlJsonText *self, const char *name, const char *value);
void        hl_json_text_boolean (HlJsonText *self, const char *name, gboolean value);
char       *hl_json_text_finish  (HlJsonText *self);   /* frees @self; everything must be ended; g_free() the text */
G_END_DECLS
