/* What the files of the window share.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#pragma once
#include "app/hl-autosave.h"
#include "app/hl-canvas.h"
#include "app/hl-file-watch.h"
#include "app/hl-window.h"
G_BEGIN_DECLS

struct _HlWindow {
  GtkApplicationWindow parent_instance;
  HlSession *session;
  HlCanvas  *canvas;
  HlAutosave *autosave;
  HlFileWatch *watch;
  char      *known_path;       /* whose content the watch knows */
  GtkWidget *start;            /* over an empty sheet; made when one is first shown */
  gboolean   may_close;        /* the question about unsaved work has been answered */
  gboolean   is_wide;          /* there is room for the glance card */
  guint      fold_source;      /* idle that shows or hides it */
  guint      divide_source;    /* timeout that divides canvas and diagram */
  int        divide_after;
  guint      trace_source;

  /* from the template */
  GtkMenuButton *open_button, *menu_button;
  GtkButton     *undo_button, *redo_button, *export_button;
  GtkLabel      *title_label, *subtitle_label;
  GtkWidget     *dirty_dot;
  GtkPaned      *outer, *work;
  GtkWidget     *shelf_bin, *canvas_bin, *strip_bin, *nameplate_bin;
  GtkBox        *notice_bin;
  GtkLabel      *zoom_label;
  GtkBox        *diagram_area;
  GtkStack      *stack;
  GtkWidget     *glance_bin;
  GtkMenuButton *variant_button;
  GtkLabel      *variant_label;
  GtkWidget     *legend;       /* of the marks on the canvas, over it */
};

void hl_window_add_actions    (HlWindow *self);     /* hl-window-actions.c */
void hl_window_update_actions (HlWindow *self);     /* what is enabled, from the state */
void hl_window_add_view_actions (HlWindow *self);   /* hl-window-view.c */
void hl_window_add_file_actions (HlWindow *self);   /* hl-window-file.c */
void hl_window_watch_disk     (HlWindow *self);     /* hl-window-disk.c */
void hl_window_unwatch_disk   (HlWindow *self);
void hl_window_know_file      (HlWindow *self);     /* what the disk has now is what the window has */
gboolean    hl_window_is_read_only (HlWindow *self);
HlFileState hl_window_file_state   (HlWindow *self);
char      **hl_window_recent_paths (guint most);    /* that still exist, the latest first; g_strfreev() */
void hl_window_add_variant_actions (HlWindow *self);    /* hl-window-variants.c */
void hl_window_update_variants (HlWindow *self);
void hl_window_add_compare_actions (HlWindow *self);    /* hl-window-compare.c */
void hl_window_update_legend   (HlWindow *self);
void hl_window_fill_menus     (HlWindow *self);     /* hl-window-menus.c */
void hl_window_place_diagram  (HlWindow *self, gboolean is_beside);
gboolean hl_window_diagram_is_beside (HlWindow *self);
gboolean hl_window_recover   (HlWindow *self, const char *kept, GError **error);    /* hl-window-recover.c */
void hl_window_show_error     (HlWindow *self, const char *title, const GError *error);
/* Runs @then at once, or after the question about unsaved work has been answered with anything but "cancel". */
void hl_window_when_safe      (HlWindow *self, void (*then) (HlWindow *self, gpointer data), gpointer data, GDestroyNotify free_data);
G_END_DECLS
