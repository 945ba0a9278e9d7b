/* What newer GTK does otherwise, in one place: file choosing, style sheets, tooltips.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "app/compat.h"
#include "plant/i18n.h"

void
hl_compat_load_css (GtkCssProvider *provider, const char *css)
{
  gtk_css_provider_load_from_data (provider, css, -1);
}

typedef struct {
  HlFileChosen done;
  gpointer     data;
} Answer;

static void
response_cb (GtkNativeDialog *dialog, int response, Answer *answer)
{
  g_autofree char *path = NULL;
  if (response == GTK_RESPONSE_ACCEPT)
    {
      g_autoptr (GFile) file = gtk_file_chooser_get_file (GTK_FILE_CHOOSER (dialog));
      path = file != NULL ? g_file_get_path (file) : NULL;
    }
  answer->done (path, answer->data);
  g_free (answer);
  g_object_unref (dialog);
}

static void
add_filter (GtkFileChooser *chooser, const char *name, const char *pattern)
{
  GtkFileFilter *filter = gtk_file_filter_new ();
  gtk_file_filter_set_name (filter, name);
  gtk_file_filter_add_pattern (filter, pattern);
  gtk_file_chooser_add_filter (chooser, filter);
  g_object_unref (filter);
}

void
hl_compat_ask_file (GtkWindow *parent, const HlFileQuestion *question, HlFileChosen done, gpointer data)
{
  GtkFileChooserAction action = question->is_save ? GTK_FILE_CHOOSER_ACTION_SAVE : GTK_FILE_CHOOSER_ACTION_OPEN;
  GtkFileChooserNative *dialog = gtk_file_chooser_native_new (question->title, parent, action, question->accept, _("Cancel"));
  GtkFileChooser *chooser = GTK_FILE_CHOOSER (dialog);
  Answer *answer = g_new (Answer, 1);

  answer->done = done;
  answer->data = data;
  gtk_native_dialog_set_modal (GTK_NATIVE_DIALOG (dialog), TRUE);
  add_filter (chooser, question->filter_name, question->pattern);
  if (question->folder != NULL)
    {
      g_autoptr (GFile) folder = g_file_new_for_path (question->folder);
      gtk_file_chooser_set_current_folder (chooser, folder, NULL);
    }
  if (question->is_save && question->name != NULL)
    gtk_file_chooser_set_current_name (chooser, question->name);
  g_signal_connect (dialog, "response", G_CALLBACK (response_cb), answer);
  gtk_native_dialog_show (GTK_NATIVE_DIALOG (dialog));
}

/* Tooltips */

static gboolean
query_tip_cb (GtkWidget *widget, int x, int y, gboolean is_keyboard, GtkTooltip *tooltip, gpointer data)
{
  const char *text = g_object_get_data (G_OBJECT (widget), "hl-tip");
  gtk_tooltip_set_text (tooltip, text);
  return text != NULL;
}

void
hl_compat_set_tip (GtkWidget *widget, const char *text)
{
  const char *former = g_object_get_data (G_OBJECT (widget), "hl-tip");
  if (g_strcmp0 (former, text) == 0)
    return;
  if (former == NULL && !gtk_widget_get_has_tooltip (widget))
    g_signal_connect (widget, "query-tooltip", G_CALLBACK (query_tip_cb), NULL);
  g_object_set_data_full (G_OBJECT (widget), "hl-tip", g_strdup (text), g_free);
  gtk_widget_set_has_tooltip (widget, TRUE);
  if (text != NULL)
    gtk_accessible_update_property (GTK_ACCESSIBLE (widget), GTK_ACCESSIBLE_PROPERTY_DESCRIPTION, text, -1);
  else
    gtk_accessible_reset_property (GTK_ACCESSIBLE (widget), GTK_ACCESSIBLE_PROPERTY_DESCRIPTION);
}
