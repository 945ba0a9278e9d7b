/* What an empty sheet offers: how to draw, templates, demo plants.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "app/hl-start.h"
#include "app/compat.h"
#include "app/hl-demos.h"
#include "plant/i18n.h"
#include "plant/template.h"

static const char *const steps[] = {
  N_("Drag components from the shelf, or press / and type a name."),
  N_("Draw lines from port to port; the ports that fit light up."),
  N_("Type values at the right. The plant solves as soon as its loop is closed; what is missing is said below the sheet."),
};

static GtkWidget *
column_new (const char *heading)
{
  GtkWidget *column = gtk_box_new (GTK_ORIENTATION_VERTICAL, 4), *label = gtk_label_new (heading);
  gtk_label_set_xalign (GTK_LABEL (label), 0.0f);
  gtk_widget_add_css_class (label, "start-heading");
  gtk_box_append (GTK_BOX (column), label);
  return column;
}

static GtkWidget *
steps_new (void)
{
  GtkWidget *column = column_new (_("Draw it"));
  for (guint n = 0; n < G_N_ELEMENTS (steps); n++)
    {
      g_autofree char *number = g_strdup_printf ("%u", n + 1);
      GtkWidget *row = gtk_box_new (GTK_ORIENTATION_HORIZONTAL, 8), *mark = gtk_label_new (number), *text = gtk_label_new (_(steps[n]));
      gtk_widget_add_css_class (mark, "start-number");
      gtk_widget_set_valign (mark, GTK_ALIGN_START);
      gtk_label_set_wrap (GTK_LABEL (text), TRUE);
      gtk_label_set_width_chars (GTK_LABEL (text), 24);
      gtk_label_set_max_width_chars (GTK_LABEL (text), 24);
      gtk_label_set_xalign (GTK_LABEL (text), 0.0f);
      gtk_box_append (GTK_BOX (row), mark);
      gtk_box_append (GTK_BOX (row), text);
      gtk_box_append (GTK_BOX (column), row);
    }
  return column;
}

static GtkWidget *
choice_new (const char *text, const char *tip)
{
  GtkWidget *button = gtk_button_new (), *label = gtk_label_new (text);
  gtk_label_set_xalign (GTK_LABEL (label), 0.0f);
  gtk_label_set_ellipsize (GTK_LABEL (label), PANGO_ELLIPSIZE_END);
  gtk_button_set_child (GTK_BUTTON (button), label);
  gtk_widget_add_css_class (button, "start-choice");
  gtk_accessible_update_property (GTK_ACCESSIBLE (button), GTK_ACCESSIBLE_PROPERTY_LABEL, text, -1);
  if (tip != NULL)
    hl_compat_set_tip (button, tip);
  return button;
}

static void
template_cb (GtkButton *button, GtkSpinButton *heaters)
{
  const HlTemplate *template = g_object_get_data (G_OBJECT (button), "template");
  gtk_widget_activate_action (GTK_WIDGET (button), "win.start-template", "(si)", template->id, gtk_spin_button_get_value_as_int (heaters));
}

static GtkWidget *
templates_new (void)
{
  GtkWidget *column = column_new (_("From a template")), *row = gtk_box_new (GTK_ORIENTATION_HORIZONTAL, 8);
  GtkWidget *label = gtk_label_new (_("Feedwater heaters")), *heaters = gtk_spin_button_new_with_range (1, 8, 1);
  gtk_spin_button_set_value (GTK_SPIN_BUTTON (heaters), 4);
  for (guint n = 0; n < hl_template_count (); n++)
    {
      const HlTemplate *template = hl_template_nth (n);
      GtkWidget *button = choice_new (_(template->name), _(template->help));
      g_object_set_data (G_OBJECT (button), "template", (gpointer) template);
      g_signal_connect_object (button, "clicked", G_CALLBACK (template_cb), heaters, 0);
      gtk_box_append (GTK_BOX (column), button);
    }
  gtk_label_set_xalign (GTK_LABEL (label), 0.0f);
  gtk_widget_set_hexpand (label, TRUE);
  gtk_widget_add_css_class (label, "quiet");
  gtk_accessible_update_property (GTK_ACCESSIBLE (heaters), GTK_ACCESSIBLE_PROPERTY_LABEL, _("Feedwater heaters of the template"), -1);
  gtk_widget_add_css_class (heaters, "start-count");
  gtk_box_append (GTK_BOX (row), label);
  gtk_box_append (GTK_BOX (row), heaters);
  gtk_box_append (GTK_BOX (column), row);
  return column;
}

static GtkWidget *
demos_new (void)
{
  g_autoptr (GPtrArray) demos = hl_demos_list ();
  GtkWidget *column = column_new (_("From a demo plant")), *list = gtk_box_new (GTK_ORIENTATION_VERTICAL, 4), *scroll = gtk_scrolled_window_new ();
  for (guint n = 0; n < demos->len; n++)
    {
      const HlDemo *demo = g_ptr_array_index (demos, n);
      GtkWidget *button = choice_new (demo->title, demo->title);
      gtk_actionable_set_action_name (GTK_ACTIONABLE (button), "win.open-demo");
      gtk_actionable_set_action_target (GTK_ACTIONABLE (button), "s", demo->file);
      gtk_box_append (GTK_BOX (list), button);
    }
  gtk_scrolled_window_set_policy (GTK_SCROLLED_WINDOW (scroll), GTK_POLICY_NEVER, GTK_POLICY_AUTOMATIC);
  gtk_scrolled_window_set_max_content_height (GTK_SCROLLED_WINDOW (scroll), 190);
  gtk_scrolled_window_set_propagate_natural_height (GTK_SCROLLED_WINDOW (scroll), TRUE);
  gtk_scrolled_window_set_child (GTK_SCROLLED_WINDOW (scroll), list);
  gtk_widget_set_vexpand (scroll, FALSE);
  gtk_box_append (GTK_BOX (column), scroll);
  return column;
}

GtkWidget *
hl_start_new (void)
{
  GtkWidget *card = gtk_box_new (GTK_ORIENTATION_VERTICAL, 10), *columns = gtk_box_new (GTK_ORIENTATION_HORIZONTAL, 22), *title = gtk_label_new (_("An empty sheet"));
  GtkWidget *parts[] = { steps_new (), templates_new (), demos_new () };
  gtk_widget_add_css_class (title, "start-title");
  gtk_label_set_xalign (GTK_LABEL (title), 0.0f);
  for (guint n = 0; n < G_N_ELEMENTS (parts); n++)
    gtk_box_append (GTK_BOX (columns), parts[n]);
  gtk_box_append (GTK_BOX (card), title);
  gtk_box_append (GTK_BOX (card), columns);
  gtk_widget_set_halign (card, GTK_ALIGN_CENTER);
  gtk_widget_set_valign (card, GTK_ALIGN_CENTER);
  gtk_widget_add_css_class (card, "start-card");
  return card;
}
