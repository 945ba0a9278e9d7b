/* Lines for whoever drives the program from outside: on standard output when HEATLOOM_TRACE=1.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#pragma once
#include <gtk/gtk.h>
G_BEGIN_DECLS
#define HL_OPTION_NAME "hl-option"     /* data of the control of an option: "T1.extractions" */
gboolean hl_trace_is_on (void);
void     hl_trace       (const char *format, ...) G_GNUC_PRINTF (1, 2);
/* "<word> <name> <x> <y>": a point of a widget in the pixels of its window, frame and shadow included. */
void     hl_trace_place (const char *word, const char *name, GtkWidget *widget, double x, double y);
G_END_DECLS
