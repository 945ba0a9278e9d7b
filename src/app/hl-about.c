/* The about window: version, licence, formulation and the caution.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "app/hl-about.h"
#include "app/hl-pane.h"
#include "plant/i18n.h"

static gboolean
close_cb (GtkWidget *window, GVariant *args, gpointer data)
{
  gtk_window_close (GTK_WINDOW (window));
  return TRUE;
}

static GtkWidget *
paragraph (const char *text, const char *css_class)
{
  GtkWidget *label = hl_pane_label (text, css_class);
  gtk_label_set_wrap (GTK_LABEL (label), TRUE);
  gtk_label_set_max_width_chars (GTK_LABEL (label), 60);
  gtk_label_set_selectable (GTK_LABEL (label), TRUE);
  gtk_widget_set_focusable (label, FALSE);
  return label;
}

static GtkWidget *
caution_card (void)
{
  GtkWidget *card = gtk_box_new (GTK_ORIENTATION_HORIZONTAL, 10), *mark = hl_grade_mark_new (HL_SHAPE_WARNING);

  gtk_widget_add_css_class (card, "pane-card");
  gtk_widget_add_css_class (card, "caution-card");
  gtk_widget_set_valign (mark, GTK_ALIGN_START);
  gtk_box_append (GTK_BOX (card), mark);
  gtk_box_append (GTK_BOX (card), paragraph (_("Thermal plants hold pressure, steam, and flammable or toxic fluids. Heatloom gives concept figures only: "
                                               "never build, set or operate equipment from them. Local codes and licensed practice decide."), NULL));
  return card;
}

static void
append_facts (GtkWidget *box)
{
  g_autofree char *water = g_strdup_printf (_("Water and steam: %s"), hl_fluid_formulation (hl_fluid_water ()));
  g_autofree char *toolkit = g_strdup_printf ("GTK %u.%u.%u", gtk_get_major_version (), gtk_get_minor_version (), gtk_get_micro_version ());

  gtk_box_append (GTK_BOX (box), paragraph (water, "quiet"));
  gtk_box_append (GTK_BOX (box), paragraph (toolkit, "quiet"));
  gtk_box_append (GTK_BOX (box), paragraph (_("Licence GPL-3.0-or-later: free to use, study, share and change; no warranty of any kind."), "quiet"));
}

void
hl_about_present (GtkWindow *parent)
{
  GtkWidget *window = gtk_window_new (), *box = gtk_box_new (GTK_ORIENTATION_VERTICAL, 8), *button = gtk_button_new_with_label (_("Close"));
  GtkEventController *keys = gtk_shortcut_controller_new ();
  g_autofree char *version = g_strdup_printf (_("Version %s"), HL_VERSION);

  gtk_window_set_title (GTK_WINDOW (window), _("About Heatloom"));
  gtk_window_set_transient_for (GTK_WINDOW (window), parent);
  gtk_window_set_modal (GTK_WINDOW (window), TRUE);
  gtk_window_set_resizable (GTK_WINDOW (window), FALSE);
  gtk_widget_add_css_class (window, "heatloom");
  gtk_widget_add_css_class (window, "about");
  gtk_widget_add_css_class (box, "dialog-box");
  gtk_box_append (GTK_BOX (box), hl_pane_label ("Heatloom", "title"));
  gtk_box_append (GTK_BOX (box), hl_pane_label (_("Thermal cycles: drawn, solved and explained"), NULL));
  gtk_box_append (GTK_BOX (box), hl_pane_label (version, "quiet"));
  gtk_box_append (GTK_BOX (box), caution_card ());
  append_facts (box);
  gtk_widget_set_halign (button, GTK_ALIGN_END);
  g_signal_connect_swapped (button, "clicked", G_CALLBACK (gtk_window_close), window);
  gtk_box_append (GTK_BOX (box), button);
  gtk_window_set_child (GTK_WINDOW (window), box);
  gtk_window_set_default_widget (GTK_WINDOW (window), button);
  gtk_window_set_focus (GTK_WINDOW (window), button);
  gtk_shortcut_controller_add_shortcut (GTK_SHORTCUT_CONTROLLER (keys),
    gtk_shortcut_new (gtk_keyval_trigger_new (GDK_KEY_Escape, 0), gtk_callback_action_new (close_cb, NULL, NULL)));
  gtk_widget_add_controller (window, keys);
  hl_pane_set_accessible (window, _("About Heatloom"), NULL);
  gtk_window_present (GTK_WINDOW (window));
}
