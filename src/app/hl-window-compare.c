/* Comparing plants on the canvas: with a variant, or with another file; and the legend of the marks.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "app/hl-window-private.h"
#include "app/compat.h"
#include "app/hl-appearance.h"
#include "app/hl-pane.h"
#include "app/hl-trace.h"
#include "draw/marks.h"
#include "plant/i18n.h"

#define SIGN 16            /* size of a sign in the legend [px] */

/* --- the legend --- */

static void
draw_sign_cb (GtkDrawingArea *area, cairo_t *cr, int width, int height, gpointer mark)
{
  hl_draw_mark (cr, hl_appearance_theme (), (HlMark) GPOINTER_TO_INT (mark), width / 2.0, height / 2.0, 6.0);
}

static void
append_count (GtkBox *box, const HlMarks *marks, HlMark mark)
{
  guint n = hl_marks_count (marks, mark);
  GtkWidget *sign;
  g_autofree char *text = g_strdup_printf ("%u %s", n, hl_mark_name (mark));
  if (n == 0)
    return;
  sign = gtk_drawing_area_new ();
  gtk_widget_set_size_request (sign, SIGN, SIGN);
  gtk_drawing_area_set_draw_func (GTK_DRAWING_AREA (sign), draw_sign_cb, GINT_TO_POINTER (mark), NULL);
  gtk_box_append (box, sign);
  gtk_box_append (box, hl_pane_label (text, NULL));
}

static void
clear (GtkWidget *box)
{
  GtkWidget *child;
  while ((child = gtk_widget_get_first_child (box)) != NULL)
    gtk_box_remove (GTK_BOX (box), child);
}

void
hl_window_update_legend (HlWindow *self)
{
  const char *name = NULL;
  HlPlant *reference = hl_session_reference (self->session, &name), *plant = hl_session_base (self->session);
  gboolean is_comparing = hl_session_is_comparing (self->session);
  g_autoptr (HlMarks) marks = NULL;
  g_autofree char *title = NULL;
  GtkWidget *end;

  gtk_widget_set_visible (self->legend, reference != NULL);
  g_simple_action_set_enabled (G_SIMPLE_ACTION (g_action_map_lookup_action (G_ACTION_MAP (self), "compare-end")), is_comparing);
  if (reference == NULL)
    return;
  clear (self->legend);
  marks = hl_marks_new (reference, plant);
  /* Translators: %s is a variant, "Base", or a file */
  title = g_strdup_printf (is_comparing ? _("Compared with “%s”") : _("Against “%s”"), name);
  gtk_box_append (GTK_BOX (self->legend), hl_pane_label (title, "legend-title"));
  for (HlMark mark = HL_MARK_ADDED; mark < HL_N_MARKS; mark++)
    append_count (GTK_BOX (self->legend), marks, mark);
  if (hl_marks_count (marks, HL_MARK_ADDED) + hl_marks_count (marks, HL_MARK_CHANGED) + hl_marks_count (marks, HL_MARK_REMOVED) == 0)
    gtk_box_append (GTK_BOX (self->legend), hl_pane_label (_("no difference"), "quiet"));
  if (!is_comparing)
    return;
  end = gtk_button_new_with_label (_("End"));
  gtk_actionable_set_action_name (GTK_ACTIONABLE (end), "win.compare-end");
  hl_pane_set_accessible (end, _("End the comparison"), NULL);
  gtk_box_append (GTK_BOX (self->legend), end);
}

/* --- actions --- */

static void
compare_variant_cb (GSimpleAction *action, GVariant *name, gpointer data)
{
  HlWindow *self = HL_WINDOW (data);
  const char *text = g_variant_get_string (name, NULL);
  int variant = *text == '\0' ? HL_DOCUMENT_BASE : hl_document_find_variant (hl_session_document (self->session), text);
  hl_session_compare_variant (self->session, variant);
}

static void
compare_with_path (HlWindow *self, const char *path)
{
  g_autoptr (GError) error = NULL;
  HlPlant *plant = hl_plant_load (path, &error);
  g_autofree char *name = g_path_get_basename (path);
  if (plant == NULL)
    hl_window_show_error (self, _("The plant to compare with could not be opened"), error);
  else
    hl_session_compare_plant (self->session, plant, name);
}

static void
compare_path_cb (GSimpleAction *action, GVariant *path, gpointer data)
{
  compare_with_path (HL_WINDOW (data), g_variant_get_string (path, NULL));
}

static void
file_chosen_cb (const char *path, gpointer data)
{
  if (path != NULL)
    compare_with_path (HL_WINDOW (data), path);
  g_object_unref (data);
}

static void
compare_file_cb (GSimpleAction *action, GVariant *parameter, gpointer data)
{
  HlWindow *self = HL_WINDOW (data);
  g_autofree char *folder = hl_session_path (self->session) != NULL ? g_path_get_dirname (hl_session_path (self->session)) : NULL;
  HlFileQuestion question = {
    .title = _("Compare with another file"), .accept = _("Compare"), .filter_name = _("Heatloom plants"), .pattern = "*.heatloom", .folder = folder,
  };
  hl_compat_ask_file (GTK_WINDOW (self), &question, file_chosen_cb, g_object_ref (self));
}

static void
end_cb (GSimpleAction *action, GVariant *parameter, gpointer data)
{
  hl_session_compare_end (HL_WINDOW (data)->session);
}

void
hl_window_add_compare_actions (HlWindow *self)
{
  static const GActionEntry entries[] = {
    { "compare-variant", compare_variant_cb, "s" },
    { "compare-file", compare_file_cb },
    { "compare-path", compare_path_cb, "s" },
    { "compare-end", end_cb },
  };
  g_action_map_add_action_entries (G_ACTION_MAP (self), entries, G_N_ELEMENTS (entries), self);
  self->legend = gtk_box_new (GTK_ORIENTATION_HORIZONTAL, 6);
  gtk_widget_add_css_class (self->legend, "marks-legend");
  gtk_widget_set_halign (self->legend, GTK_ALIGN_START);
  gtk_widget_set_valign (self->legend, GTK_ALIGN_END);
  gtk_widget_set_visible (self->legend, FALSE);
  gtk_overlay_add_overlay (GTK_OVERLAY (self->canvas_bin), self->legend);
}
