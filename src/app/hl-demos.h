/* The demo plants that come with the program.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#pragma once
#include <glib.h>
G_BEGIN_DECLS
typedef struct { char *file, *title; } HlDemo;      /* file: name in the examples folder, for the action "win.open-demo" */
/* By file name; those that cannot be read are left out. g_ptr_array_unref(). */
GPtrArray *hl_demos_list (void);
G_END_DECLS
