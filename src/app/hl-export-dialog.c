/* The "Hand over" window: what to export, in which format and theme, with a live preview.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "app/hl-export-dialog.h"
#include "app/compat.h"
#include "app/hl-pane.h"
#include "draw/export.h"
#include "draw/report.h"
#include "draw/xlsx.h"
#include "plant/i18n.h"

#define WIDTH 900
#define HEIGHT 540

struct _HlExportDialog {
  GtkWindow  parent_instance;
  HlSession *session;
  GtkWidget *what, *format_label, *format, *theme_label, *theme;
  GtkWidget *stack, *picture, *text, *remark, *note, *save;
};

G_DEFINE_FINAL_TYPE (HlExportDialog, hl_export_dialog, GTK_TYPE_WINDOW)

static const char *const what_names[] = { N_("Drawing"), N_("State diagram"), N_("h-s diagram"), N_("p-h diagram"),
                                         N_("Composite curves"), N_("Energy bands"), N_("Exergy bands"), N_("Exergy destroyed, bars"), N_("Ledger"),
                                         N_("Heat balance drawing, A3"), N_("Report, PDF"), N_("Workbook, all tables"), NULL };
static const char *const what_suffixes[] = { "drawing", "states", "hs", "ph", "heat", "bands", "exergy-bands", "exergy-bars", "ledger", "sheet", "report", "tables" };
static const HlPicture what_pictures[] = { HL_PICTURE_DRAWING, HL_PICTURE_STATE_DIAGRAM, HL_PICTURE_HS_DIAGRAM, HL_PICTURE_PH_DIAGRAM,
                                           HL_PICTURE_HEAT, HL_PICTURE_BANDS, HL_PICTURE_EXERGY_BANDS, HL_PICTURE_EXERGY_BARS };
static const struct { const char *name, *filter, *pattern, *ending; } formats[] = {
  [HL_FORMAT_SVG] = { N_("SVG, scales to any size"), N_("SVG pictures"), "*.svg", "svg" },
  [HL_FORMAT_PDF] = { N_("PDF, for print and papers"), N_("PDF documents"), "*.pdf", "pdf" },
  [HL_FORMAT_PNG] = { N_("PNG, for slides and mail"), N_("PNG pictures"), "*.png", "png" },
};
static const HlThemeId themes[] = { HL_THEME_PAPER, HL_THEME_LIGHT, HL_THEME_DARK };
static const char *const theme_names[] = { N_("Paper, white ground"), N_("Light, as on screen"), N_("Dark, as on screen"), NULL };

static HlHandOver
chosen_what (HlExportDialog *self)
{
  return (HlHandOver) gtk_drop_down_get_selected (GTK_DROP_DOWN (self->what));
}

static HlFormat
chosen_format (HlExportDialog *self)
{
  return (HlFormat) gtk_drop_down_get_selected (GTK_DROP_DOWN (self->format));
}

static HlThemeId
chosen_theme (HlExportDialog *self)
{
  return themes[gtk_drop_down_get_selected (GTK_DROP_DOWN (self->theme))];
}

/* What has one form only: its ending and what the file dialog says of it; NULL for pictures. */
static const struct { const char *ending, *filter, *pattern, *remark; } documents[HL_HAND_OVER_WORKBOOK + 1] = {
  [HL_HAND_OVER_LEDGER] = { "csv", N_("Comma-separated tables"), "*.csv", N_("Comma-separated table, units in the headings, decimal points") },
  [HL_HAND_OVER_REPORT] = { "pdf", N_("PDF documents"), "*.pdf", N_("Basis, drawing, diagrams, tables, findings, assumed values and equations; shown here: performance") },
  [HL_HAND_OVER_WORKBOOK] = { "xlsx", N_("Workbooks"), "*.xlsx", N_("Performance, streams, components, values and findings, a sheet each; shown here: performance") },
};

static gboolean
is_document (HlExportDialog *self)
{
  return documents[chosen_what (self)].ending != NULL;
}

static HlPicture
chosen_picture (HlExportDialog *self)
{
  return what_pictures[chosen_what (self)];
}

static void
show_note (HlExportDialog *self, const char *text)
{
  gtk_label_set_text (GTK_LABEL (self->note), text != NULL ? text : "");
  gtk_widget_set_visible (self->note, text != NULL);
}

/* --- the preview: the exported bytes themselves --- */

static void
preview_picture (HlExportDialog *self)
{
  g_autoptr (GError) error = NULL;
  const HlSolution *solution = hl_session_solution (self->session);
  g_autoptr (GBytes) bytes = chosen_what (self) == HL_HAND_OVER_SHEET
    ? hl_export_sheet (solution, HL_PAPER_A3, NULL, 0.0, HL_FORMAT_PNG, &error)
    : hl_export_picture (solution, chosen_picture (self), HL_FORMAT_PNG, chosen_theme (self), 0.0, 0.0, 1.0, &error);
  g_autoptr (GdkTexture) texture = bytes != NULL ? gdk_texture_new_from_bytes (bytes, &error) : NULL;

  gtk_picture_set_paintable (GTK_PICTURE (self->picture), GDK_PAINTABLE (texture));
  gtk_stack_set_visible_child (GTK_STACK (self->stack), self->picture);
  show_note (self, error != NULL ? error->message : NULL);
}

static void
preview_table (HlExportDialog *self)
{
  const HlSolution *solution = hl_session_solution (self->session);
  g_autoptr (HlTable) summary = hl_table_summary (solution, hl_pane_units (self->session));
  g_autofree char *text = chosen_what (self) == HL_HAND_OVER_LEDGER ? hl_ledger_csv (solution, hl_pane_units (self->session))
                                                                    : hl_table_text (summary);

  gtk_text_buffer_set_text (gtk_text_view_get_buffer (GTK_TEXT_VIEW (self->text)), text, -1);
  gtk_stack_set_visible_child (GTK_STACK (self->stack), gtk_widget_get_parent (self->text));
  show_note (self, NULL);
}

static void
update (HlExportDialog *self)
{
  gboolean is_table = is_document (self), has_theme = !is_table && chosen_what (self) != HL_HAND_OVER_SHEET;

  gtk_widget_set_sensitive (self->format_label, !is_table);
  gtk_widget_set_sensitive (self->format, !is_table);
  gtk_widget_set_sensitive (self->theme_label, has_theme);
  gtk_widget_set_sensitive (self->theme, has_theme);
  gtk_label_set_text (GTK_LABEL (self->remark), is_table ? _(documents[chosen_what (self)].remark)
                                                         : _("Colours and fonts as they will be in the file"));
  if (is_table)
    preview_table (self);
  else
    preview_picture (self);
}

/* --- writing --- */

/* The ending that was typed decides the format; without one the chosen format adds its own. */
static char *
full_path (HlExportDialog *self, const char *path)
{
  g_autofree char *name = g_path_get_basename (path);
  const char *ending = is_document (self) ? documents[chosen_what (self)].ending : formats[chosen_format (self)].ending;

  return strchr (name, '.') != NULL ? g_strdup (path) : g_strdup_printf ("%s.%s", path, ending);
}

/* The ending names another thing than what is chosen: a report in a file called .svg helps nobody. */
static gboolean
check_ending (HlExportDialog *self, const char *path, GError **error)
{
  g_autofree char *lower = g_ascii_strdown (path, -1), *ending = g_strconcat (".", documents[chosen_what (self)].ending, NULL);

  if (g_str_has_suffix (lower, ending))
    return TRUE;
  g_set_error (error, G_IO_ERROR, G_IO_ERROR_INVALID_FILENAME, _("%s: let the file's name end in %s"), path, ending);
  return FALSE;
}

static gboolean
write_bytes (HlExportDialog *self, const char *path, GError **error)
{
  const HlSolution *solution = hl_session_solution (self->session);
  HlDocument *document = hl_session_document (self->session);
  int variant = hl_session_variant (self->session);
  g_autoptr (HlComparison) comparison = hl_document_n_variants (document) > 0 ? hl_comparison_new (document, HL_DOCUMENT_BASE, FALSE, NULL) : NULL;
  const HlSheetFields fields = { .variant = variant != HL_DOCUMENT_BASE ? hl_document_variant_name (document, variant) : NULL, .comparison = comparison };
  g_autoptr (GBytes) bytes = NULL;
  HlFormat format;

  switch (chosen_what (self))
    {
    case HL_HAND_OVER_REPORT:
      bytes = check_ending (self, path, error) ? hl_export_report (solution, HL_PAPER_A3, &fields, error) : NULL;
      break;
    case HL_HAND_OVER_WORKBOOK:
      bytes = check_ending (self, path, error) ? hl_export_workbook_with (solution, comparison, hl_pane_units (self->session), error) : NULL;
      break;
    case HL_HAND_OVER_SHEET:
    default:
      bytes = hl_format_from_path (path, &format, error) ? hl_export_sheet (solution, HL_PAPER_A3, &fields, 0.0, format, error) : NULL;
    }
  return bytes != NULL && hl_export_bytes_file (bytes, path, error);
}

gboolean
hl_export_dialog_write (HlExportDialog *self, const char *path)
{
  const HlSolution *solution = hl_session_solution (self->session);
  g_autofree char *full = full_path (self, path), *message = NULL;
  g_autoptr (GError) error = NULL;
  HlFormat format;
  gboolean done;

  if (chosen_what (self) == HL_HAND_OVER_LEDGER)
    {
      g_autofree char *csv = hl_ledger_csv (solution, hl_pane_units (self->session));
      done = hl_export_text_file (csv, full, &error);
    }
  else if (chosen_what (self) >= HL_HAND_OVER_SHEET)
    done = write_bytes (self, full, &error);
  else
    done = hl_format_from_path (full, &format, &error)
           && hl_export_picture_file (solution, chosen_picture (self), format, chosen_theme (self), full, &error);
  show_note (self, done ? NULL : error->message);
  if (done)
    {
      message = g_strdup_printf (_("Written: %s"), full);
      g_signal_emit_by_name (self->session, "message", message);
    }
  return done;
}

static void
file_chosen_cb (const char *path, gpointer data)
{
  HlExportDialog *self = data;

  if (path != NULL && hl_export_dialog_write (self, path))
    gtk_window_destroy (GTK_WINDOW (self));
  g_object_unref (self);
}

/* The name of the plant's file or, where it has none yet, its title; without what file systems or shells dislike. */
static char *
proposed_name (HlExportDialog *self)
{
  const char *path = hl_session_path (self->session);
  g_autofree char *title = path != NULL ? g_path_get_basename (path) : hl_session_display_name (self->session);
  char *ending = strstr (title, ".heatloom");
  if (ending != NULL)
    *ending = '\0';
  char *name = g_strdup_printf ("%s-%s.%s", title, what_suffixes[chosen_what (self)],
                                is_document (self) ? documents[chosen_what (self)].ending : formats[chosen_format (self)].ending);

  g_strdelimit (name, "/\\:*?\"<>|", '-');
  g_strdelimit (name, " ", '-');
  return name;
}

static void
save_clicked_cb (GtkButton *button, HlExportDialog *self)
{
  gboolean is_table = is_document (self);
  const char *path = hl_session_path (self->session);
  g_autofree char *folder = path != NULL ? g_path_get_dirname (path) : NULL, *name = proposed_name (self);
  HlFileQuestion question = {
    .title = _("Hand over"), .accept = _("Save"),
    .filter_name = is_table ? _(documents[chosen_what (self)].filter) : _(formats[chosen_format (self)].filter),
    .pattern = is_table ? documents[chosen_what (self)].pattern : formats[chosen_format (self)].pattern,
    .folder = folder, .name = name, .is_save = TRUE,
  };

  show_note (self, NULL);
  hl_compat_ask_file (GTK_WINDOW (self), &question, file_chosen_cb, g_object_ref (self));
}

/* --- life --- */

static GtkWidget *
chooser (HlExportDialog *self, GtkWidget *grid, int row, const char *title, const char *const *names, GtkWidget **label_out)
{
  GtkStringList *list = gtk_string_list_new (NULL);
  GtkWidget *label = hl_pane_label (title, "quiet"), *drop;

  for (int n = 0; names[n] != NULL; n++)
    gtk_string_list_append (list, _(names[n]));
  drop = gtk_drop_down_new (G_LIST_MODEL (list), NULL);
  hl_pane_set_accessible (drop, title, NULL);
  g_signal_connect_swapped (drop, "notify::selected", G_CALLBACK (update), self);
  gtk_grid_attach (GTK_GRID (grid), label, 0, 2 * row, 1, 1);
  gtk_grid_attach (GTK_GRID (grid), drop, 0, 2 * row + 1, 1, 1);
  if (label_out != NULL)
    *label_out = label;
  return drop;
}

static GtkWidget *
build_choices (HlExportDialog *self)
{
  const char *format_names[G_N_ELEMENTS (formats) + 1] = { NULL };
  GtkWidget *grid = gtk_grid_new ();

  for (guint n = 0; n < G_N_ELEMENTS (formats); n++)
    format_names[n] = formats[n].name;
  gtk_grid_set_row_spacing (GTK_GRID (grid), 4);
  gtk_widget_add_css_class (grid, "choices");
  self->what = chooser (self, grid, 0, _("What"), what_names, NULL);
  self->format = chooser (self, grid, 1, _("Format"), format_names, &self->format_label);
  self->theme = chooser (self, grid, 2, _("Colours"), theme_names, &self->theme_label);
  return grid;
}

static GtkWidget *
build_preview (HlExportDialog *self)
{
  GtkWidget *scroller = gtk_scrolled_window_new ();

  self->picture = gtk_picture_new ();
  gtk_picture_set_can_shrink (GTK_PICTURE (self->picture), TRUE);
  gtk_picture_set_content_fit (GTK_PICTURE (self->picture), GTK_CONTENT_FIT_CONTAIN);
  gtk_picture_set_alternative_text (GTK_PICTURE (self->picture), _("Preview"));
  self->text = gtk_text_view_new ();
  gtk_text_view_set_editable (GTK_TEXT_VIEW (self->text), FALSE);
  gtk_text_view_set_cursor_visible (GTK_TEXT_VIEW (self->text), FALSE);
  gtk_text_view_set_monospace (GTK_TEXT_VIEW (self->text), TRUE);
  hl_pane_set_accessible (self->text, _("Preview"), NULL);
  gtk_scrolled_window_set_child (GTK_SCROLLED_WINDOW (scroller), self->text);
  self->stack = gtk_stack_new ();
  gtk_stack_add_child (GTK_STACK (self->stack), self->picture);
  gtk_stack_add_child (GTK_STACK (self->stack), scroller);
  gtk_widget_set_hexpand (self->stack, TRUE);
  gtk_widget_set_vexpand (self->stack, TRUE);
  gtk_widget_add_css_class (self->stack, "preview");
  gtk_widget_set_overflow (self->stack, GTK_OVERFLOW_HIDDEN);
  return self->stack;
}

static GtkWidget *
build_buttons (HlExportDialog *self)
{
  GtkWidget *row = gtk_box_new (GTK_ORIENTATION_HORIZONTAL, 8), *cancel = gtk_button_new_with_label (_("Cancel"));

  self->note = hl_pane_label ("", "note");
  gtk_widget_add_css_class (self->note, "error");
  gtk_label_set_wrap (GTK_LABEL (self->note), TRUE);
  gtk_widget_set_hexpand (self->note, TRUE);
  gtk_widget_set_visible (self->note, FALSE);
  self->save = gtk_button_new_with_label (_("Save…"));
  gtk_widget_add_css_class (self->save, "suggested-action");
  gtk_widget_set_valign (self->save, GTK_ALIGN_END);
  gtk_widget_set_valign (cancel, GTK_ALIGN_END);
  g_signal_connect_swapped (cancel, "clicked", G_CALLBACK (gtk_window_close), self);
  g_signal_connect (self->save, "clicked", G_CALLBACK (save_clicked_cb), self);
  GtkWidget *spring = gtk_label_new ("");
  gtk_widget_set_hexpand (spring, TRUE);
  gtk_box_append (GTK_BOX (row), self->note);
  gtk_box_append (GTK_BOX (row), spring);
  gtk_box_append (GTK_BOX (row), cancel);
  gtk_box_append (GTK_BOX (row), self->save);
  return row;
}

static void
hl_export_dialog_dispose (GObject *object)
{
  HlExportDialog *self = HL_EXPORT_DIALOG (object);
  if (self->session != NULL)
    g_signal_handlers_disconnect_by_data (self->session, self);
  g_clear_object (&self->session);
  G_OBJECT_CLASS (hl_export_dialog_parent_class)->dispose (object);
}

static void
hl_export_dialog_class_init (HlExportDialogClass *klass)
{
  G_OBJECT_CLASS (klass)->dispose = hl_export_dialog_dispose;
  gtk_widget_class_add_binding_action (GTK_WIDGET_CLASS (klass), GDK_KEY_Escape, 0, "window.close", NULL);
}

static void
hl_export_dialog_init (HlExportDialog *self)
{
  GtkWidget *box = gtk_box_new (GTK_ORIENTATION_VERTICAL, 14), *middle = gtk_box_new (GTK_ORIENTATION_HORIZONTAL, 18);
  GtkWidget *left = gtk_box_new (GTK_ORIENTATION_VERTICAL, 10);

  gtk_window_set_title (GTK_WINDOW (self), _("Hand over"));
  gtk_window_set_default_size (GTK_WINDOW (self), WIDTH, HEIGHT);
  gtk_widget_add_css_class (GTK_WIDGET (self), "heatloom");
  gtk_widget_add_css_class (GTK_WIDGET (self), "export");
  gtk_widget_add_css_class (box, "dialog-box");
  self->remark = hl_pane_label ("", "quiet");
  gtk_label_set_wrap (GTK_LABEL (self->remark), TRUE);
  gtk_label_set_max_width_chars (GTK_LABEL (self->remark), 26);
  gtk_box_append (GTK_BOX (left), build_choices (self));
  gtk_box_append (GTK_BOX (left), self->remark);
  gtk_box_append (GTK_BOX (middle), left);
  gtk_box_append (GTK_BOX (middle), build_preview (self));
  gtk_box_append (GTK_BOX (box), middle);
  gtk_box_append (GTK_BOX (box), build_buttons (self));
  gtk_window_set_child (GTK_WINDOW (self), box);
  gtk_window_set_default_widget (GTK_WINDOW (self), self->save);
}

void
hl_export_dialog_present (GtkWindow *parent, HlSession *session)
{
  HlExportDialog *self = g_object_new (HL_TYPE_EXPORT_DIALOG, "transient-for", parent, "modal", TRUE,
                                       "destroy-with-parent", TRUE, NULL);

  self->session = g_object_ref (session);
  g_signal_connect_swapped (session, "changed", G_CALLBACK (update), self);
  update (self);
  gtk_window_present (GTK_WINDOW (self));
}
