/* A line above the canvas that says something about the file and offers what to do about it.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "app/hl-notice.h"

#define KEY "hl-notice"

static void
clicked_cb (GtkButton *button, GtkBox *box)
{
  const char *action = g_object_get_data (G_OBJECT (button), "action");
  /* The action first: afterwards the button is gone, and with it the way to the window. */
  if (action != NULL)
    gtk_widget_activate_action (GTK_WIDGET (button), action, NULL);
  hl_notice_hide (box);
}

void
hl_notice_hide (GtkBox *box)
{
  GtkWidget *notice = g_object_get_data (G_OBJECT (box), KEY);
  if (notice == NULL)
    return;
  g_object_set_data (G_OBJECT (box), KEY, NULL);
  gtk_box_remove (box, notice);
}

void
hl_notice_show (GtkBox *box, const char *text, const HlNoticeButton *buttons)
{
  GtkWidget *notice = gtk_box_new (GTK_ORIENTATION_HORIZONTAL, 8), *label = gtk_label_new (text);

  hl_notice_hide (box);
  gtk_label_set_wrap (GTK_LABEL (label), TRUE);
  gtk_label_set_xalign (GTK_LABEL (label), 0.0f);
  gtk_widget_set_hexpand (label, TRUE);
  gtk_accessible_update_property (GTK_ACCESSIBLE (notice), GTK_ACCESSIBLE_PROPERTY_LABEL, text, -1);
  gtk_widget_add_css_class (notice, "notice");
  gtk_box_append (GTK_BOX (notice), label);
  for (guint n = 0; buttons[n].label != NULL; n++)
    {
      GtkWidget *button = gtk_button_new_with_label (buttons[n].label);
      gtk_widget_set_valign (button, GTK_ALIGN_CENTER);
      g_object_set_data (G_OBJECT (button), "action", (gpointer) buttons[n].action);
      g_signal_connect (button, "clicked", G_CALLBACK (clicked_cb), box);
      gtk_box_append (GTK_BOX (notice), button);
    }
  gtk_box_prepend (box, notice);
  g_object_set_data (G_OBJECT (box), KEY, notice);
}
