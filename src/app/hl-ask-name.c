/* Asks for a name in a small window.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "app/hl-ask-name.h"
#include "app/hl-pane.h"
#include "app/hl-trace.h"
#include "plant/i18n.h"

typedef struct {
  GtkWidget     *window, *entry, *note;
  HlCheckName    check;
  HlNameGiven    done;
  gpointer       data;
  GDestroyNotify free_data;
} Ask;

static void
window_gone_cb (gpointer data, GObject *window)
{
  Ask *ask = data;
  if (ask->free_data != NULL)
    ask->free_data (ask->data);
  g_free (ask);
}

static char *
typed (Ask *ask)
{
  return g_strstrip (g_strdup (gtk_editable_get_text (GTK_EDITABLE (ask->entry))));
}

static void
accept_cb (Ask *ask)
{
  g_autofree char *name = typed (ask);
  g_autoptr (GError) error = NULL;
  if (!ask->check (name, ask->data, &error))
    {
      gtk_label_set_text (GTK_LABEL (ask->note), error->message);
      gtk_widget_set_visible (ask->note, TRUE);
      gtk_widget_add_css_class (ask->entry, "error");
      gtk_widget_grab_focus (ask->entry);
      return;
    }
  ask->done (name, ask->data);
  gtk_window_destroy (GTK_WINDOW (ask->window));
}

static void
changed_cb (Ask *ask)
{
  gtk_widget_set_visible (ask->note, FALSE);
  gtk_widget_remove_css_class (ask->entry, "error");
}

static void
cancel_cb (Ask *ask)
{
  gtk_window_destroy (GTK_WINDOW (ask->window));
}

static GtkWidget *
buttons_new (Ask *ask, const char *accept)
{
  GtkWidget *row = gtk_box_new (GTK_ORIENTATION_HORIZONTAL, 8);
  GtkWidget *cancel = gtk_button_new_with_label (_("Cancel")), *take = gtk_button_new_with_label (accept);
  gtk_widget_set_halign (row, GTK_ALIGN_END);
  gtk_widget_add_css_class (row, "buttons");
  gtk_widget_add_css_class (take, "suggested-action");
  gtk_box_append (GTK_BOX (row), cancel);
  gtk_box_append (GTK_BOX (row), take);
  g_signal_connect_swapped (cancel, "clicked", G_CALLBACK (cancel_cb), ask);
  g_signal_connect_swapped (take, "clicked", G_CALLBACK (accept_cb), ask);
  return row;
}

static gboolean
escape_cb (GtkWidget *window, GVariant *args, gpointer data)
{
  gtk_window_close (GTK_WINDOW (window));
  return TRUE;
}

static void
add_escape (GtkWidget *window)
{
  GtkEventController *keys = gtk_shortcut_controller_new ();
  gtk_shortcut_controller_add_shortcut (GTK_SHORTCUT_CONTROLLER (keys),
                                        gtk_shortcut_new (gtk_keyval_trigger_new (GDK_KEY_Escape, 0), gtk_callback_action_new (escape_cb, NULL, NULL)));
  gtk_widget_add_controller (window, keys);
}

void
hl_ask_name (GtkWindow *parent, const char *title, const char *accept, const char *proposal,
             HlCheckName check, HlNameGiven done, gpointer data, GDestroyNotify free_data)
{
  Ask *ask = g_new0 (Ask, 1);
  GtkWidget *box = gtk_box_new (GTK_ORIENTATION_VERTICAL, 10), *heading = hl_pane_label (title, "title");

  *ask = (Ask) { gtk_window_new (), gtk_entry_new (), hl_pane_label ("", "note"), check, done, data, free_data };
  g_object_weak_ref (G_OBJECT (ask->window), window_gone_cb, ask);
  gtk_window_set_title (GTK_WINDOW (ask->window), "Heatloom");
  gtk_window_set_transient_for (GTK_WINDOW (ask->window), parent);
  gtk_window_set_modal (GTK_WINDOW (ask->window), TRUE);
  gtk_window_set_destroy_with_parent (GTK_WINDOW (ask->window), TRUE);
  gtk_window_set_resizable (GTK_WINDOW (ask->window), FALSE);
  gtk_widget_add_css_class (ask->window, "heatloom");
  gtk_widget_add_css_class (ask->window, "confirm");
  gtk_widget_add_css_class (box, "dialog-box");
  gtk_editable_set_text (GTK_EDITABLE (ask->entry), proposal);
  gtk_editable_set_width_chars (GTK_EDITABLE (ask->entry), 34);
  gtk_entry_set_max_length (GTK_ENTRY (ask->entry), 120);
  hl_pane_set_accessible (ask->entry, title, NULL);
  gtk_widget_add_css_class (ask->note, "error");
  gtk_label_set_wrap (GTK_LABEL (ask->note), TRUE);
  gtk_label_set_max_width_chars (GTK_LABEL (ask->note), 42);
  gtk_widget_set_visible (ask->note, FALSE);
  g_signal_connect_swapped (ask->entry, "activate", G_CALLBACK (accept_cb), ask);
  g_signal_connect_swapped (ask->entry, "changed", G_CALLBACK (changed_cb), ask);
  gtk_box_append (GTK_BOX (box), heading);
  gtk_box_append (GTK_BOX (box), ask->entry);
  gtk_box_append (GTK_BOX (box), ask->note);
  gtk_box_append (GTK_BOX (box), buttons_new (ask, accept));
  gtk_window_set_child (GTK_WINDOW (ask->window), box);
  gtk_window_set_focus (GTK_WINDOW (ask->window), ask->entry);
  gtk_editable_select_region (GTK_EDITABLE (ask->entry), 0, -1);
  add_escape (ask->window);
  hl_pane_set_accessible (ask->window, title, NULL);
  gtk_window_present (GTK_WINDOW (ask->window));
  hl_trace ("asks for a name");
}
