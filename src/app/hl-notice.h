/* A line above the canvas that says something about the file and offers what to do about it.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#pragma once
#include <gtk/gtk.h>
G_BEGIN_DECLS

typedef struct {
  const char *label;                /* translated */
  const char *action;               /* detailed action name, "win.revert"; NULL: only puts the notice away */
} HlNoticeButton;

/* Shows a notice as the first child of @box, in place of one that is there. @buttons: ended by a NULL label; each puts the notice away. */
void hl_notice_show (GtkBox *box, const char *text, const HlNoticeButton *buttons);
void hl_notice_hide (GtkBox *box);
G_END_DECLS
