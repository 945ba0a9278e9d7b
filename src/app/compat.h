/* What newer GTK does otherwise, in one place: file choosing, style sheets.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#pragma once
#include <gtk/gtk.h>
G_BEGIN_DECLS
void hl_compat_load_css (GtkCssProvider *provider, const char *css);

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
