/* A question with buttons over a window.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "app/hl-confirm.h"
#include "app/hl-pane.h"

typedef struct {
  void    (*done) (int button, gpointer data);
  gpointer  data;
  int       answer;
} Question;

/* Runs when the window goes, whichever way: so exactly once. */
static void
window_gone_cb (gpointer data, GObject *window)
{
  Question *question = data;

  if (question->done != NULL)
    question->done (question->answer, question->data);
  g_free (question);
}

static void
button_clicked_cb (GtkButton *button, Question *question)
{
  question->answer = GPOINTER_TO_INT (g_object_get_data (G_OBJECT (button), "hl-answer"));
  gtk_window_destroy (GTK_WINDOW (gtk_widget_get_root (GTK_WIDGET (button))));
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
  GtkShortcut *shortcut = gtk_shortcut_new (gtk_keyval_trigger_new (GDK_KEY_Escape, 0), gtk_callback_action_new (escape_cb, NULL, NULL));
  gtk_shortcut_controller_add_shortcut (GTK_SHORTCUT_CONTROLLER (keys), shortcut);
  gtk_widget_add_controller (window, keys);
}

static GtkWidget *
button_row (GtkWidget *window, const char *const *buttons, Question *question)
{
  GtkWidget *row = gtk_box_new (GTK_ORIENTATION_HORIZONTAL, 8), *button = NULL;

  gtk_widget_set_halign (row, GTK_ALIGN_END);
  gtk_widget_add_css_class (row, "buttons");
  for (int n = 0; buttons[n] != NULL; n++)
    {
      button = gtk_button_new_with_label (buttons[n]);
      g_object_set_data (G_OBJECT (button), "hl-answer", GINT_TO_POINTER (n));
      g_signal_connect (button, "clicked", G_CALLBACK (button_clicked_cb), question);
      gtk_box_append (GTK_BOX (row), button);
    }
  if (button != NULL)
    {
      gtk_widget_add_css_class (button, "suggested-action");
      gtk_window_set_default_widget (GTK_WINDOW (window), button);
    }
  return row;
}

void
hl_confirm (GtkWindow *parent, const char *title, const char *body, const char *const *buttons,
            void (*done) (int button, gpointer data), gpointer data)
{
  GtkWidget *window = gtk_window_new (), *box = gtk_box_new (GTK_ORIENTATION_VERTICAL, 10);
  GtkWidget *heading = hl_pane_label (title, "title"), *text = hl_pane_label (body, NULL);
  Question *question = g_new (Question, 1);

  *question = (Question) { done, data, -1 };
  g_object_weak_ref (G_OBJECT (window), window_gone_cb, question);
  gtk_window_set_title (GTK_WINDOW (window), "Heatloom");
  gtk_window_set_transient_for (GTK_WINDOW (window), parent);
  gtk_window_set_modal (GTK_WINDOW (window), TRUE);
  gtk_window_set_resizable (GTK_WINDOW (window), FALSE);
  gtk_widget_add_css_class (window, "heatloom");
  gtk_widget_add_css_class (window, "confirm");
  gtk_label_set_wrap (GTK_LABEL (heading), TRUE);
  gtk_label_set_wrap (GTK_LABEL (text), TRUE);
  gtk_label_set_max_width_chars (GTK_LABEL (text), 52);
  gtk_label_set_max_width_chars (GTK_LABEL (heading), 44);
  gtk_widget_add_css_class (box, "dialog-box");
  gtk_box_append (GTK_BOX (box), heading);
  gtk_box_append (GTK_BOX (box), text);
  gtk_window_set_child (GTK_WINDOW (window), box);
  gtk_box_append (GTK_BOX (box), button_row (window, buttons, question));
  /* The focus can only go to what is in the window already. */
  gtk_window_set_focus (GTK_WINDOW (window), gtk_window_get_default_widget (GTK_WINDOW (window)));
  add_escape (window);
  hl_pane_set_accessible (window, title, body);
  gtk_window_present (GTK_WINDOW (window));
}
