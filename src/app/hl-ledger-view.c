/* The table of all streams: sortable, its selection linked with the session, copied as text with Ctrl+C.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "app/hl-ledger-view.h"
#include "app/hl-ledger-line.h"
#include "app/hl-pane.h"
#include "app/hl-settings.h"
#include "plant/i18n.h"

#define COLUMN_KEY "hl-column"

struct _HlLedgerView {
  GtkWidget         parent_instance;
  HlSession        *session;
  GListStore       *lines;           /* HlLedgerLine in the order of the plant */
  GtkSelectionModel *selection;
  GtkWidget        *scroller, *table, *empty;
  GSimpleActionGroup *actions;       /* "show-p" and the like: which columns are shown */
  GMenu            *column_menu;     /* of every heading */
  HlUnitSet         units;           /* in the headings */
  gboolean          is_linking;      /* one selection follows the other */
};

G_DEFINE_FINAL_TYPE (HlLedgerView, hl_ledger_view, GTK_TYPE_WIDGET)

/* --- cells --- */

static guint
column_of (gpointer object)
{
  return GPOINTER_TO_UINT (g_object_get_data (object, COLUMN_KEY));
}

static void
show_cell (HlLedgerLine *line, GtkListItem *item)
{
  GtkWidget *label = gtk_list_item_get_child (item);
  gtk_label_set_text (GTK_LABEL (label), hl_ledger_line_text (line, column_of (label)));
}

static void
cell_setup_cb (GtkSignalListItemFactory *factory, GtkListItem *item, gpointer data)
{
  guint column = GPOINTER_TO_UINT (data);
  gboolean is_text = hl_ledger_column (column)->is_text;
  GtkWidget *label = hl_pane_label ("", is_text ? "text" : "number");

  g_object_set_data (G_OBJECT (label), COLUMN_KEY, data);
  gtk_label_set_xalign (GTK_LABEL (label), is_text ? 0.0f : 1.0f);
  gtk_label_set_single_line_mode (GTK_LABEL (label), TRUE);
  gtk_list_item_set_child (item, label);
}

static void
cell_bind_cb (GtkSignalListItemFactory *factory, GtkListItem *item, gpointer data)
{
  HlLedgerLine *line = gtk_list_item_get_item (item);
  show_cell (line, item);
  g_signal_connect_object (line, "changed", G_CALLBACK (show_cell), item, 0);
}

static void
cell_unbind_cb (GtkSignalListItemFactory *factory, GtkListItem *item, gpointer data)
{
  g_signal_handlers_disconnect_by_data (gtk_list_item_get_item (item), item);
}

static int
compare_cb (gconstpointer a, gconstpointer b, gpointer data)
{
  return hl_ledger_line_compare ((HlLedgerLine *) a, (HlLedgerLine *) b, GPOINTER_TO_UINT (data));
}

static void
add_column (HlLedgerView *self, guint column)
{
  GtkListItemFactory *factory = gtk_signal_list_item_factory_new ();
  gpointer data = GUINT_TO_POINTER (column);
  g_autofree char *heading = hl_ledger_heading (column, self->units);

  g_signal_connect (factory, "setup", G_CALLBACK (cell_setup_cb), data);
  g_signal_connect (factory, "bind", G_CALLBACK (cell_bind_cb), data);
  g_signal_connect (factory, "unbind", G_CALLBACK (cell_unbind_cb), data);
  g_autoptr (GtkColumnViewColumn) view_column = gtk_column_view_column_new (heading, factory);
  g_autoptr (GtkSorter) sorter = GTK_SORTER (gtk_custom_sorter_new (compare_cb, data, NULL));
  gtk_column_view_column_set_sorter (view_column, sorter);
  gtk_column_view_column_set_resizable (view_column, TRUE);
  g_object_set_data (G_OBJECT (view_column), COLUMN_KEY, data);
  gtk_column_view_column_set_header_menu (view_column, G_MENU_MODEL (self->column_menu));
  gtk_column_view_append_column (GTK_COLUMN_VIEW (self->table), view_column);
}

/* --- which columns --- */

/* The number says which stream a row is: it always stays. */
static gboolean
can_hide (guint column)
{
  return strcmp (hl_ledger_column (column)->key, "id") != 0;
}

static char *
action_name (guint column)
{
  g_autofree char *name = g_strdup_printf ("show-%s", hl_ledger_column (column)->key);
  return g_strdelimit (g_steal_pointer (&name), "_", '-');
}

static gboolean
is_shown (HlLedgerView *self, guint column)
{
  g_autofree char *name = action_name (column);
  g_autoptr (GVariant) state = g_action_group_get_action_state (G_ACTION_GROUP (self->actions), name);
  return state == NULL || g_variant_get_boolean (state);
}

static void
save_columns (HlLedgerView *self)
{
  g_autoptr (GString) hidden = g_string_new (NULL);

  for (guint n = 0; n < hl_ledger_n_columns (); n++)
    if (!is_shown (self, n))
      g_string_append_printf (hidden, "%s%s", hidden->len > 0 ? "," : "", hl_ledger_column (n)->key);
  hl_settings_set_string ("ledger-hidden", hidden->str);
}

static void
show_columns (HlLedgerView *self)
{
  GListModel *columns = gtk_column_view_get_columns (GTK_COLUMN_VIEW (self->table));

  for (guint n = 0; n < g_list_model_get_n_items (columns); n++)
    {
      g_autoptr (GtkColumnViewColumn) column = g_list_model_get_item (columns, n);
      gtk_column_view_column_set_visible (column, is_shown (self, column_of (column)));
    }
}

static void
show_column_cb (GSimpleAction *action, GVariant *state, gpointer data)
{
  HlLedgerView *self = data;

  g_simple_action_set_state (action, state);
  show_columns (self);
  save_columns (self);
}

static void
add_column_actions (HlLedgerView *self)
{
  g_autofree char *remembered = hl_settings_get_string ("ledger-hidden", "");
  g_auto (GStrv) hidden = g_strsplit (remembered, ",", -1);
  g_autoptr (GMenu) section = g_menu_new ();

  self->actions = g_simple_action_group_new ();
  for (guint n = 0; n < hl_ledger_n_columns (); n++)
    {
      const HlLedgerColumn *column = hl_ledger_column (n);
      g_autofree char *name = action_name (n), *full = g_strconcat ("ledger.", name, NULL);
      gboolean shown = !g_strv_contains ((const char *const *) hidden, column->key);
      if (!can_hide (n))
        continue;
      g_autoptr (GSimpleAction) action = g_simple_action_new_stateful (name, NULL, g_variant_new_boolean (shown));
      g_signal_connect (action, "change-state", G_CALLBACK (show_column_cb), self);
      g_action_map_add_action (G_ACTION_MAP (self->actions), G_ACTION (action));
      g_menu_append (section, _(column->name), full);
    }
  self->column_menu = g_menu_new ();
  g_menu_append_section (self->column_menu, _("Columns"), G_MENU_MODEL (section));
  gtk_widget_insert_action_group (GTK_WIDGET (self), "ledger", G_ACTION_GROUP (self->actions));
}

/* The number of the stream, its figures, then the words: figures are what a ledger is read for. */
static void
add_columns (HlLedgerView *self)
{
  for (int round = 0; round < 3; round++)
    for (guint n = 0; n < hl_ledger_n_columns (); n++)
      {
        const HlLedgerColumn *column = hl_ledger_column (n);
        int place = strcmp (column->key, "id") == 0 ? 0 : column->is_text ? 2 : 1;
        if (place == round)
          add_column (self, n);
      }
}

static void
show_headings (HlLedgerView *self)
{
  GListModel *columns = gtk_column_view_get_columns (GTK_COLUMN_VIEW (self->table));

  for (guint n = 0; n < g_list_model_get_n_items (columns); n++)
    {
      g_autoptr (GtkColumnViewColumn) column = g_list_model_get_item (columns, n);
      g_autofree char *heading = hl_ledger_heading (column_of (column), self->units);
      gtk_column_view_column_set_title (column, heading);
    }
}

/* The headings of numbers stand over them, at the right; the column view has no word for that. */
static void
align_headings (HlLedgerView *self)
{
  GtkWidget *title = gtk_widget_get_first_child (gtk_widget_get_first_child (self->table));
  GListModel *columns = gtk_column_view_get_columns (GTK_COLUMN_VIEW (self->table));

  for (guint n = 0; title != NULL && n < g_list_model_get_n_items (columns); n++, title = gtk_widget_get_next_sibling (title))
    {
      g_autoptr (GtkColumnViewColumn) column = g_list_model_get_item (columns, n);
      GtkWidget *box = gtk_widget_get_first_child (title);
      if (box != NULL && !hl_ledger_column (column_of (column))->is_text)
        gtk_widget_set_halign (box, GTK_ALIGN_END);
    }
}

/* --- following the plant --- */

static gboolean
same_streams (HlLedgerView *self, const HlPlant *plant)
{
  guint n_streams = hl_plant_n_streams (plant);

  if (g_list_model_get_n_items (G_LIST_MODEL (self->lines)) != n_streams)
    return FALSE;
  for (guint n = 0; n < n_streams; n++)
    {
      g_autoptr (HlLedgerLine) line = g_list_model_get_item (G_LIST_MODEL (self->lines), n);
      if (hl_ledger_line_id (line) != hl_plant_stream (plant, n)->id)
        return FALSE;
    }
  return TRUE;
}

static void
replace_lines (HlLedgerView *self, const HlPlant *plant)
{
  g_autoptr (GPtrArray) lines = g_ptr_array_new_with_free_func (g_object_unref);

  for (guint n = 0; n < hl_plant_n_streams (plant); n++)
    g_ptr_array_add (lines, hl_ledger_line_new (hl_plant_stream (plant, n)->id));
  g_list_store_splice (self->lines, 0, g_list_model_get_n_items (G_LIST_MODEL (self->lines)), lines->pdata, lines->len);
}

static void
show_selection (HlLedgerView *self)
{
  guint n_rows = g_list_model_get_n_items (G_LIST_MODEL (self->selection)), first = GTK_INVALID_LIST_POSITION;
  g_autoptr (GtkBitset) selected = gtk_bitset_new_empty (), mask = gtk_bitset_new_range (0, n_rows);

  for (guint n = 0; n < n_rows; n++)
    {
      g_autoptr (HlLedgerLine) line = g_list_model_get_item (G_LIST_MODEL (self->selection), n);
      if (!hl_session_is_selected (self->session, hl_ledger_line_id (line)))
        continue;
      gtk_bitset_add (selected, n);
      if (first == GTK_INVALID_LIST_POSITION)
        first = n;
    }
  self->is_linking = TRUE;
  gtk_selection_model_set_selection (self->selection, selected, mask);
  self->is_linking = FALSE;
  if (first != GTK_INVALID_LIST_POSITION && gtk_widget_get_last_child (self->table) != NULL)
    gtk_widget_activate_action (gtk_widget_get_last_child (self->table), "list.scroll-to-item", "u", first);
}

static void
update (HlLedgerView *self)
{
  const HlSolution *solution = hl_session_solution (self->session);
  const HlPlant *plant = hl_solution_plant (solution);
  gboolean is_other = !same_streams (self, plant);

  if (hl_plant_units (plant) != self->units)
    {
      self->units = hl_plant_units (plant);
      show_headings (self);
    }
  self->is_linking = TRUE;
  if (is_other)
    replace_lines (self, plant);
  for (guint n = 0; n < hl_plant_n_streams (plant); n++)
    {
      g_autoptr (HlLedgerLine) line = g_list_model_get_item (G_LIST_MODEL (self->lines), n);
      hl_ledger_line_update (line, solution, n, self->units);
    }
  /* New numbers may change the order. */
  gtk_sorter_changed (gtk_column_view_get_sorter (GTK_COLUMN_VIEW (self->table)), GTK_SORTER_CHANGE_DIFFERENT);
  self->is_linking = FALSE;
  if (is_other)
    show_selection (self);
  gtk_widget_set_visible (self->scroller, hl_plant_n_streams (plant) > 0);
  gtk_widget_set_visible (self->empty, hl_plant_n_streams (plant) == 0);
}

/* Only while it can be seen: edits come many a second. */
static void
changed_cb (HlLedgerView *self)
{
  if (gtk_widget_get_mapped (GTK_WIDGET (self)))
    update (self);
}

static void
selection_changed_cb (HlLedgerView *self)
{
  if (!self->is_linking && gtk_widget_get_mapped (GTK_WIDGET (self)))
    show_selection (self);
}

static void
rows_selected_cb (HlLedgerView *self)
{
  g_autoptr (GPtrArray) ids = g_ptr_array_new ();

  if (self->is_linking)
    return;
  for (guint n = 0; n < g_list_model_get_n_items (G_LIST_MODEL (self->selection)); n++)
    {
      g_autoptr (HlLedgerLine) line = g_list_model_get_item (G_LIST_MODEL (self->selection), n);
      if (gtk_selection_model_is_selected (self->selection, n))
        g_ptr_array_add (ids, (gpointer) hl_ledger_line_id (line));
    }
  self->is_linking = TRUE;
  hl_session_select_many (self->session, (const char *const *) ids->pdata, ids->len);
  self->is_linking = FALSE;
}

/* --- copying --- */

/* The columns that are shown; @line NULL: their headings. */
static void
append_cells (HlLedgerView *self, GString *text, HlLedgerLine *line)
{
  gboolean is_first = TRUE;

  for (guint n = 0; n < hl_ledger_n_columns (); n++)
    {
      g_autofree char *heading = line == NULL ? hl_ledger_heading (n, self->units) : NULL;
      if (!is_shown (self, n))
        continue;
      g_string_append_printf (text, "%s%s", is_first ? "" : "\t", line != NULL ? hl_ledger_line_text (line, n) : heading);
      is_first = FALSE;
    }
  g_string_append_c (text, '\n');
}

char *
hl_ledger_view_text (HlLedgerView *self)
{
  GString *text = g_string_new (NULL);
  g_autoptr (GtkBitset) selected = gtk_selection_model_get_selection (self->selection);
  gboolean all = gtk_bitset_is_empty (selected);

  update (self);
  append_cells (self, text, NULL);
  for (guint n = 0; n < g_list_model_get_n_items (G_LIST_MODEL (self->selection)); n++)
    {
      g_autoptr (HlLedgerLine) line = g_list_model_get_item (G_LIST_MODEL (self->selection), n);
      if (all || gtk_bitset_contains (selected, n))
        append_cells (self, text, line);
    }
  return g_string_free (text, FALSE);
}

static gboolean
copy_cb (GtkWidget *widget, GVariant *args, gpointer data)
{
  HlLedgerView *self = HL_LEDGER_VIEW (widget);
  g_autofree char *text = hl_ledger_view_text (self);

  gdk_clipboard_set_text (gtk_widget_get_clipboard (widget), text);
  g_signal_emit_by_name (self->session, "message", _("The ledger is on the clipboard"));
  return TRUE;
}

/* --- life --- */

static void
hl_ledger_view_map (GtkWidget *widget)
{
  update (HL_LEDGER_VIEW (widget));
  show_selection (HL_LEDGER_VIEW (widget));
  GTK_WIDGET_CLASS (hl_ledger_view_parent_class)->map (widget);
}

static void
hl_ledger_view_dispose (GObject *object)
{
  HlLedgerView *self = HL_LEDGER_VIEW (object);
  GtkWidget *child;

  if (self->session != NULL)
    g_signal_handlers_disconnect_by_data (self->session, self);
  if (self->selection != NULL)
    g_signal_handlers_disconnect_by_data (self->selection, self);
  while ((child = gtk_widget_get_first_child (GTK_WIDGET (self))) != NULL)
    gtk_widget_unparent (child);
  g_clear_object (&self->selection);
  g_clear_object (&self->lines);
  g_clear_object (&self->actions);
  g_clear_object (&self->column_menu);
  g_clear_object (&self->session);
  G_OBJECT_CLASS (hl_ledger_view_parent_class)->dispose (object);
}

static void
hl_ledger_view_class_init (HlLedgerViewClass *klass)
{
  GtkWidgetClass *widget_class = GTK_WIDGET_CLASS (klass);
  G_OBJECT_CLASS (klass)->dispose = hl_ledger_view_dispose;
  widget_class->map = hl_ledger_view_map;
  gtk_widget_class_set_layout_manager_type (widget_class, GTK_TYPE_BIN_LAYOUT);
  gtk_widget_class_set_css_name (widget_class, "ledgerview");
  gtk_widget_class_add_binding (widget_class, GDK_KEY_c, GDK_CONTROL_MASK, copy_cb, NULL);
}

static void
hl_ledger_view_init (HlLedgerView *self)
{
  GtkSortListModel *sorted;

  self->lines = g_list_store_new (HL_TYPE_LEDGER_LINE);
  self->table = gtk_column_view_new (NULL);
  sorted = gtk_sort_list_model_new (g_object_ref (G_LIST_MODEL (self->lines)),
                                          g_object_ref (gtk_column_view_get_sorter (GTK_COLUMN_VIEW (self->table))));
  self->selection = GTK_SELECTION_MODEL (gtk_multi_selection_new (G_LIST_MODEL (sorted)));
  gtk_column_view_set_model (GTK_COLUMN_VIEW (self->table), self->selection);
  gtk_column_view_set_show_row_separators (GTK_COLUMN_VIEW (self->table), TRUE);
  hl_pane_set_accessible (self->table, _("Ledger of all streams"), _("Ctrl+C copies the selected rows"));
  g_signal_connect_swapped (self->selection, "selection-changed", G_CALLBACK (rows_selected_cb), self);
  add_column_actions (self);
  add_columns (self);
  show_columns (self);
  align_headings (self);
  self->scroller = gtk_scrolled_window_new ();
  gtk_scrolled_window_set_child (GTK_SCROLLED_WINDOW (self->scroller), self->table);
  gtk_widget_set_vexpand (self->scroller, TRUE);
  gtk_widget_set_parent (self->scroller, GTK_WIDGET (self));
  self->empty = hl_pane_label (_("No streams yet: draw a line from port to port."), "quiet");
  gtk_widget_set_halign (self->empty, GTK_ALIGN_CENTER);
  gtk_widget_set_valign (self->empty, GTK_ALIGN_CENTER);
  gtk_widget_set_parent (self->empty, GTK_WIDGET (self));
}

GtkWidget *
hl_ledger_view_new (HlSession *session)
{
  HlLedgerView *self = g_object_new (HL_TYPE_LEDGER_VIEW, NULL);

  self->session = g_object_ref (session);
  self->units = HL_N_UNIT_SETS;            /* none: the headings are still to be set */
  g_signal_connect_swapped (session, "changed", G_CALLBACK (changed_cb), self);
  g_signal_connect_swapped (session, "selection-changed", G_CALLBACK (selection_changed_cb), self);
  update (self);
  return GTK_WIDGET (self);
}
