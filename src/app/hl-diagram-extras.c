/* The button in the state diagram that switches what it shows beside the cycle.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "app/hl-diagram-extras.h"
#include "app/hl-pane.h"
#include "draw/state-diagram.h"
#include "plant/i18n.h"

#define FLAGS "hl-diagram-extras"

guint
hl_diagram_extras_button_flags (GtkWidget *button)
{
  return GPOINTER_TO_UINT (g_object_get_data (G_OBJECT (button), FLAGS));
}

static void
toggled_cb (GtkCheckButton *check, GtkWidget *button)
{
  guint flag = GPOINTER_TO_UINT (g_object_get_data (G_OBJECT (check), FLAGS)), flags = hl_diagram_extras_button_flags (button);

  flags = gtk_check_button_get_active (check) ? flags | flag : flags & ~flag;
  g_object_set_data (G_OBJECT (button), FLAGS, GUINT_TO_POINTER (flags));
  GCallback changed = g_object_get_data (G_OBJECT (button), "hl-changed");
  ((void (*) (gpointer)) changed) (g_object_get_data (G_OBJECT (button), "hl-data"));
}

GtkWidget *
hl_diagram_extras_button_new (void (*changed) (gpointer data), gpointer data)
{
  GtkWidget *button = gtk_menu_button_new (), *popover = gtk_popover_new (), *box = gtk_box_new (GTK_ORIENTATION_VERTICAL, 4);

  g_object_set_data (G_OBJECT (button), "hl-changed", (gpointer) G_CALLBACK (changed));
  g_object_set_data (G_OBJECT (button), "hl-data", data);
  for (guint n = 0; n < HL_N_DIAGRAM_EXTRAS; n++)
    {
      GtkWidget *check = gtk_check_button_new_with_label (hl_diagram_extra_name (n));
      g_object_set_data (G_OBJECT (check), FLAGS, GUINT_TO_POINTER (1u << n));
      g_signal_connect (check, "toggled", G_CALLBACK (toggled_cb), button);
      gtk_box_append (GTK_BOX (box), check);
    }
  gtk_popover_set_child (GTK_POPOVER (popover), box);
  gtk_menu_button_set_popover (GTK_MENU_BUTTON (button), popover);
  gtk_menu_button_set_label (GTK_MENU_BUTTON (button), _("Show"));
  hl_pane_set_accessible (button, _("What the state diagram shows beside the cycle"), NULL);
  gtk_widget_set_tooltip_text (button, _("What the state diagram shows beside the cycle"));
  return button;
}
