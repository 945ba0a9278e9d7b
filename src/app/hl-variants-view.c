/* The page of variants: what they change, what comes of it, and how they differ from one of them.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "app/hl-variants-view.h"
#include "app/hl-pane.h"
#include "app/hl-trace.h"
#include "plant/i18n.h"

#define DELAY 120           /* milliseconds after an edit: while a value is being moved nobody reads the other variants */

struct _HlVariantsView {
  GtkWidget     parent_instance;
  HlSession    *session;
  GtkWidget    *bar, *reference, *at_duty, *scroller, *empty;
  HlComparison *comparison;         /* NULL: to be made, or there are no variants */
  HlComparison *former;             /* whose solutions may serve again */
  char         *reference_name;     /* "" for the base */
  gboolean      is_filling;
  guint         source;
};

G_DEFINE_FINAL_TYPE (HlVariantsView, hl_variants_view, GTK_TYPE_WIDGET)

/* --- the grid --- */

static GtkWidget *
cell_label (const char *text, const char *css_class, float xalign)
{
  GtkWidget *label = hl_pane_label (text, css_class);
  gtk_label_set_xalign (GTK_LABEL (label), xalign);
  gtk_widget_add_css_class (label, "cell");
  return label;
}

static void
header_cb (GtkButton *button, HlVariantsView *self)
{
  hl_session_show_variant (self->session, GPOINTER_TO_INT (g_object_get_data (G_OBJECT (button), "hl-variant")));
}

static void
attach_headers (HlVariantsView *self, GtkGrid *grid)
{
  guint n = hl_comparison_n_columns (self->comparison);
  for (guint i = 0; i < n; i++)
    {
      const char *name = hl_comparison_name (self->comparison, i);
      GtkWidget *button = gtk_button_new_with_label (name);
      g_autofree char *tip = g_strdup_printf (_("Look at “%s”"), name);
      gtk_button_set_has_frame (GTK_BUTTON (button), FALSE);
      gtk_widget_add_css_class (button, "variant-head");
      if ((int) i - 1 == hl_session_variant (self->session))
        gtk_widget_add_css_class (button, "in-view");
      gtk_widget_set_halign (button, GTK_ALIGN_END);
      g_object_set_data (G_OBJECT (button), "hl-variant", GINT_TO_POINTER ((int) i - 1));
      g_signal_connect (button, "clicked", G_CALLBACK (header_cb), self);
      hl_pane_set_accessible (button, tip, NULL);
      gtk_grid_attach (grid, button, 1 + 2 * (int) i, 0, 1, 1);
    }
}

static void
attach_row (HlVariantsView *self, GtkGrid *grid, const HlComparisonRow *row, int at)
{
  guint n = hl_comparison_n_columns (self->comparison), reference = hl_comparison_reference (self->comparison);
  gtk_grid_attach (grid, cell_label (row->name, "row-name", 0.0f), 0, at, 1, 1);
  for (guint i = 0; i < n; i++)
    {
      const HlComparisonCell *cell = &row->cells[i];
      gboolean is_strong = row->group == HL_ROW_RESULT ? i == reference || *cell->difference != '\0' : cell->is_own;
      GtkWidget *label = cell_label (*cell->text != '\0' ? cell->text : "–", is_strong ? NULL : "same", 1.0f);
      if (row->group == HL_ROW_CHANGE && cell->is_own)
        gtk_widget_add_css_class (label, "own");
      if (row->group == HL_ROW_DUTY && cell->is_own)
        gtk_widget_add_css_class (label, "not-held");
      gtk_grid_attach (grid, label, 1 + 2 * (int) i, at, 1, 1);
      if (i != reference)
        gtk_grid_attach (grid, cell_label (cell->difference, "difference", 1.0f), 2 + 2 * (int) i, at, 1, 1);
    }
}

static GtkWidget *
build_grid (HlVariantsView *self)
{
  static const char *const headings[] = { N_("What they change"), N_("What comes of it"), N_("Duties") };
  GtkWidget *grid = gtk_grid_new ();
  int at = 1, last_group = -1, width = 1 + 2 * (int) hl_comparison_n_columns (self->comparison);
  gtk_widget_add_css_class (grid, "variants-grid");
  gtk_widget_set_halign (grid, GTK_ALIGN_START);
  gtk_widget_set_valign (grid, GTK_ALIGN_START);
  attach_headers (self, GTK_GRID (grid));
  for (guint i = 0; i < hl_comparison_n_rows (self->comparison); i++)
    {
      const HlComparisonRow *row = hl_comparison_row (self->comparison, i);
      if ((int) row->group != last_group)
        gtk_grid_attach (GTK_GRID (grid), cell_label (_(headings[row->group]), "group-heading", 0.0f), 0, at++, width, 1);
      last_group = (int) row->group;
      attach_row (self, GTK_GRID (grid), row, at++);
    }
  for (guint i = 0; i < hl_comparison_n_notes (self->comparison); i++)
    {
      GtkWidget *note = cell_label (hl_comparison_note (self->comparison, i), "note", 0.0f);
      gtk_label_set_wrap (GTK_LABEL (note), TRUE);
      gtk_grid_attach (GTK_GRID (grid), note, 0, at++, width, 1);
    }
  return grid;
}

/* --- what is compared --- */

static int
reference_variant (HlVariantsView *self)
{
  return *self->reference_name == '\0' ? HL_DOCUMENT_BASE
                                       : hl_document_find_variant (hl_session_document (self->session), self->reference_name);
}

static void
fill_reference (HlVariantsView *self)
{
  HlDocument *document = hl_session_document (self->session);
  g_autoptr (GtkStringList) names = gtk_string_list_new (NULL);
  gtk_string_list_append (names, C_("variant", "Base"));
  for (guint i = 0; i < hl_document_n_variants (document); i++)
    gtk_string_list_append (names, hl_document_variant_name (document, (int) i));
  self->is_filling = TRUE;
  gtk_drop_down_set_model (GTK_DROP_DOWN (self->reference), G_LIST_MODEL (names));
  gtk_drop_down_set_selected (GTK_DROP_DOWN (self->reference), (guint) (reference_variant (self) + 1));
  self->is_filling = FALSE;
}

static void
bring_up_to_date (HlVariantsView *self)
{
  HlDocument *document = hl_session_document (self->session);
  gboolean is_empty = hl_document_n_variants (document) == 0;
  g_clear_handle_id (&self->source, g_source_remove);
  if (self->comparison != NULL)
    return;
  gtk_widget_set_visible (self->empty, is_empty);
  gtk_widget_set_visible (self->bar, !is_empty);
  gtk_widget_set_visible (self->scroller, !is_empty);
  if (is_empty)
    {
      g_clear_pointer (&self->former, hl_comparison_unref);
      return;
    }
  self->comparison = hl_comparison_new (document, reference_variant (self), gtk_check_button_get_active (GTK_CHECK_BUTTON (self->at_duty)), self->former);
  g_clear_pointer (&self->former, hl_comparison_unref);
  self->former = hl_comparison_ref (self->comparison);
  fill_reference (self);
  gtk_scrolled_window_set_child (GTK_SCROLLED_WINDOW (self->scroller), build_grid (self));
  hl_trace ("variants compared");
}

static gboolean
due_cb (gpointer data)
{
  HlVariantsView *self = data;
  self->source = 0;
  bring_up_to_date (self);
  return G_SOURCE_REMOVE;
}

static void
renew (HlVariantsView *self, guint delay)
{
  g_clear_pointer (&self->comparison, hl_comparison_unref);
  if (self->source == 0 && gtk_widget_get_mapped (GTK_WIDGET (self)))
    self->source = g_timeout_add (delay, due_cb, self);
}

static void
changed_cb (HlVariantsView *self)
{
  renew (self, DELAY);
}

static void
reference_cb (HlVariantsView *self)
{
  guint selected = gtk_drop_down_get_selected (GTK_DROP_DOWN (self->reference));
  if (self->is_filling || selected == GTK_INVALID_LIST_POSITION)
    return;
  hl_variants_view_set_reference (self, (int) selected - 1);
}

static void
at_duty_cb (HlVariantsView *self)
{
  renew (self, 0);
}

static void
copy_cb (GtkButton *button, HlVariantsView *self)
{
  HlComparison *comparison = hl_variants_view_comparison (self);
  g_autoptr (HlTable) table = comparison != NULL ? hl_table_variants (comparison) : NULL;
  g_autofree char *text = table != NULL ? hl_table_tabbed (table) : NULL;
  if (text == NULL)
    return;
  gdk_clipboard_set_text (gtk_widget_get_clipboard (GTK_WIDGET (self)), text);
  g_signal_emit_by_name (self->session, "message", _("The table is on the clipboard, for a spreadsheet or a text"));
}

/* --- life --- */

static void
hl_variants_view_map (GtkWidget *widget)
{
  GTK_WIDGET_CLASS (hl_variants_view_parent_class)->map (widget);
  if (HL_VARIANTS_VIEW (widget)->comparison == NULL)
    renew (HL_VARIANTS_VIEW (widget), 0);
}

static void
hl_variants_view_dispose (GObject *object)
{
  HlVariantsView *self = HL_VARIANTS_VIEW (object);
  GtkWidget *child;
  g_clear_handle_id (&self->source, g_source_remove);
  if (self->session != NULL)
    g_signal_handlers_disconnect_by_data (self->session, self);
  while ((child = gtk_widget_get_first_child (GTK_WIDGET (self))) != NULL)
    gtk_widget_unparent (child);
  g_clear_pointer (&self->comparison, hl_comparison_unref);
  g_clear_pointer (&self->former, hl_comparison_unref);
  g_clear_object (&self->session);
  G_OBJECT_CLASS (hl_variants_view_parent_class)->dispose (object);
}

static void
hl_variants_view_finalize (GObject *object)
{
  g_free (HL_VARIANTS_VIEW (object)->reference_name);
  G_OBJECT_CLASS (hl_variants_view_parent_class)->finalize (object);
}

static void
hl_variants_view_class_init (HlVariantsViewClass *klass)
{
  GtkWidgetClass *widget = GTK_WIDGET_CLASS (klass);
  G_OBJECT_CLASS (klass)->dispose = hl_variants_view_dispose;
  G_OBJECT_CLASS (klass)->finalize = hl_variants_view_finalize;
  widget->map = hl_variants_view_map;
  gtk_widget_class_set_css_name (widget, "variantsview");
  gtk_widget_class_set_layout_manager_type (widget, GTK_TYPE_BOX_LAYOUT);
}

static void
build_bar (HlVariantsView *self)
{
  GtkWidget *copy = gtk_button_new_with_label (_("Copy as text"));
  self->bar = gtk_box_new (GTK_ORIENTATION_HORIZONTAL, 8);
  gtk_widget_add_css_class (self->bar, "variants-bar");
  gtk_box_append (GTK_BOX (self->bar), hl_pane_label (_("Differences from"), "quiet"));
  self->reference = gtk_drop_down_new (NULL, NULL);
  hl_pane_set_accessible (self->reference, _("Differences from"), NULL);
  gtk_box_append (GTK_BOX (self->bar), self->reference);
  self->at_duty = gtk_check_button_new_with_label (_("at equal duty"));
  gtk_widget_set_tooltip_text (self->at_duty, _("Flows, powers and heats that the reference gives are given to the others too"));
  gtk_box_append (GTK_BOX (self->bar), self->at_duty);
  gtk_widget_set_hexpand (copy, TRUE);
  gtk_widget_set_halign (copy, GTK_ALIGN_END);
  gtk_box_append (GTK_BOX (self->bar), copy);
  g_signal_connect_swapped (self->reference, "notify::selected", G_CALLBACK (reference_cb), self);
  g_signal_connect_swapped (self->at_duty, "toggled", G_CALLBACK (at_duty_cb), self);
  g_signal_connect (copy, "clicked", G_CALLBACK (copy_cb), self);
  gtk_widget_set_parent (self->bar, GTK_WIDGET (self));
}

static void
build_empty (HlVariantsView *self)
{
  GtkWidget *text = hl_pane_label (_("A variant is a what-if: it holds only what differs from the base. Make one, change a value, and both stand here side by side."), "quiet");
  GtkWidget *button = gtk_button_new_with_label (_("New variant …"));
  gtk_label_set_wrap (GTK_LABEL (text), TRUE);
  gtk_label_set_max_width_chars (GTK_LABEL (text), 60);
  gtk_label_set_justify (GTK_LABEL (text), GTK_JUSTIFY_CENTER);
  gtk_actionable_set_action_name (GTK_ACTIONABLE (button), "win.variant-new");
  gtk_widget_set_halign (button, GTK_ALIGN_CENTER);
  self->empty = gtk_box_new (GTK_ORIENTATION_VERTICAL, 10);
  gtk_widget_set_vexpand (self->empty, TRUE);
  gtk_widget_set_hexpand (self->empty, TRUE);
  gtk_widget_set_valign (self->empty, GTK_ALIGN_CENTER);
  gtk_widget_set_halign (self->empty, GTK_ALIGN_CENTER);
  gtk_box_append (GTK_BOX (self->empty), text);
  gtk_box_append (GTK_BOX (self->empty), button);
  gtk_widget_set_parent (self->empty, GTK_WIDGET (self));
}

static void
hl_variants_view_init (HlVariantsView *self)
{
  gtk_orientable_set_orientation (GTK_ORIENTABLE (gtk_widget_get_layout_manager (GTK_WIDGET (self))), GTK_ORIENTATION_VERTICAL);
  self->reference_name = g_strdup ("");
  build_bar (self);
  self->scroller = gtk_scrolled_window_new ();
  gtk_widget_set_vexpand (self->scroller, TRUE);
  gtk_widget_set_hexpand (self->scroller, TRUE);
  gtk_widget_set_parent (self->scroller, GTK_WIDGET (self));
  build_empty (self);
}

GtkWidget *
hl_variants_view_new (HlSession *session)
{
  HlVariantsView *self = g_object_new (HL_TYPE_VARIANTS_VIEW, NULL);
  self->session = g_object_ref (session);
  g_signal_connect_swapped (session, "changed", G_CALLBACK (changed_cb), self);
  return GTK_WIDGET (self);
}

HlComparison *
hl_variants_view_comparison (HlVariantsView *self)
{
  g_return_val_if_fail (HL_IS_VARIANTS_VIEW (self), NULL);
  bring_up_to_date (self);
  return self->comparison;
}

void
hl_variants_view_set_reference (HlVariantsView *self, int variant)
{
  g_return_if_fail (HL_IS_VARIANTS_VIEW (self));
  g_free (self->reference_name);
  self->reference_name = g_strdup (hl_document_variant_name (hl_session_document (self->session), variant));
  renew (self, 0);
}

void
hl_variants_view_set_at_duty (HlVariantsView *self, gboolean at_duty)
{
  g_return_if_fail (HL_IS_VARIANTS_VIEW (self));
  gtk_check_button_set_active (GTK_CHECK_BUTTON (self->at_duty), at_duty);
}
