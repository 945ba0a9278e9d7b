/* What newer GTK does otherwise, in one place: file choosing, style sheets, tooltips.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#pragma once
#include <gtk/gtk.h>
G_BEGIN_DECLS
void hl_compat_load_css (GtkCssProvider *provider, const char *css);

/* A tooltip that is asked for when the pointer rests.  gtk_widget_set_tooltip_text() waits three times for the display's
 * answer, which shows where a window sets fifty of them. @text may be NULL; it also describes the widget to a screen reader. */
void hl_compat_set_tip (GtkWidget *widget, const char *text);

/* Asks for a file of one type. @done gets the chosen path, or NULL where the dialog was closed. */
typedef void (*HlFileChosen) (const char *path, gpointer data);
typedef struct {
  const char *title;          /* translated */
  const char *accept;         /* translated button text */
  const char *filter_name;    /* translated: "Heatloom plants" */
  const char *pattern;        /* "*.heatloom" */
  const char *folder;         /* where to begin; or NULL */
  const char *name;           /* proposed name when saving; or NULL */
  gboolean    is_save;
} HlFileQuestion;
void hl_compat_ask_file (GtkWindow *parent, const HlFileQuestion *question, HlFileChosen done, gpointer data);
G_END_DECLS
