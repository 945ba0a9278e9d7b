/* All media compared by a simple cycle, to choose one for a circuit.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "app/hl-media-dialog.h"
#include "app/hl-medium-row.h"
#include "app/hl-pane.h"
#include "plant/circuit.h"
#include "plant/fluid-words.h"
#include "plant/i18n.h"

#include <math.h>

#define TEMPERATURES_OF_A_FRESH_CIRCUIT 423.15, 288.15

/* --- a medium of the table --- */

#define HL_TYPE_MEDIA_ITEM (hl_media_item_get_type ())
G_DECLARE_FINAL_TYPE (HlMediaItem, hl_media_item, HL, MEDIA_ITEM, GObject)
struct _HlMediaItem {
  GObject        parent_instance;
  const HlFluid *fluid;
  HlFluidCycle   cycle;
};
G_DEFINE_FINAL_TYPE (HlMediaItem, hl_media_item, G_TYPE_OBJECT)
static void hl_media_item_class_init (HlMediaItemClass *klass) { }
static void hl_media_item_init (HlMediaItem *self) { }

typedef struct {
  HlSession    *session;
  const char   *stream;                    /* interned */
  GtkWidget    *window, *search, *source, *sink, *error, *view, *use, *count;
  GListStore   *store;
  GtkFilter    *filter;
  GtkSorter    *sorter;
  GtkSingleSelection *selection;
} Dialog;

/* --- columns --- */

static HlUnitSet
units_of (const Dialog *self)
{
  return hl_plant_units (hl_session_plant (self->session));
}

static char *
text_of_name (const Dialog *self, const HlMediaItem *item)
{
  return g_strdup (hl_words_of_fluid (item->fluid));
}

static char *
text_of_kind (const Dialog *self, const HlMediaItem *item)
{
  HlFluidFacts facts;
  hl_fluid_facts (item->fluid, &facts);
  return g_strdup (hl_words_of_expansion (facts.expansion));
}

static char *
text_of_safety (const Dialog *self, const HlMediaItem *item)
{
  return hl_words_of_safety (item->fluid);
}

static char *
text_of_evaporation (const Dialog *self, const HlMediaItem *item)
{
  if (item->cycle.possible != HL_CYCLE_POSSIBLE)
    return g_strdup ("–");
  return hl_units_format (item->cycle.p_evaporation, HL_DIMENSION_PRESSURE, units_of (self));
}

static char *
text_of_condensation (const Dialog *self, const HlMediaItem *item)
{
  if (item->cycle.possible != HL_CYCLE_POSSIBLE)
    return g_strdup ("–");
  return hl_units_format (item->cycle.p_condensation, HL_DIMENSION_PRESSURE, units_of (self));
}

static char *
text_of_ratio (const Dialog *self, const HlMediaItem *item)
{
  return item->cycle.possible == HL_CYCLE_POSSIBLE ? g_strdup_printf ("%.2f", item->cycle.volume_ratio) : g_strdup ("–");
}

static char *
text_of_efficiency (const Dialog *self, const HlMediaItem *item)
{
  return item->cycle.possible == HL_CYCLE_POSSIBLE ? g_strdup_printf ("%.2f %%", 100.0 * item->cycle.efficiency) : g_strdup ("–");
}

static char *
text_of_exhaust (const Dialog *self, const HlMediaItem *item)
{
  if (item->cycle.possible != HL_CYCLE_POSSIBLE)
    return g_strdup (hl_words_of_cycle (item->cycle.possible));
  if (item->cycle.moisture > 0.0)
    return g_strdup_printf (_("%.1f %% moisture"), 100.0 * item->cycle.moisture);
  return g_strdup_printf (_("%.1f K superheated"), item->cycle.superheat);
}

typedef struct {
  const char *title;
  char     *(*text)  (const Dialog *self, const HlMediaItem *item);
  double    (*value) (const HlMediaItem *item);      /* what is sorted by; NULL: the text */
  gboolean    is_number;
} Column;

static double value_of_evaporation (const HlMediaItem *item) { return item->cycle.p_evaporation; }
static double value_of_condensation (const HlMediaItem *item) { return item->cycle.p_condensation; }
static double value_of_ratio (const HlMediaItem *item) { return item->cycle.volume_ratio; }
static double value_of_efficiency (const HlMediaItem *item) { return item->cycle.efficiency; }

enum { COLUMN_EFFICIENCY = 1 };
static const Column columns[] = {
  { N_("Medium"), text_of_name, NULL, FALSE },
  { N_("Efficiency"), text_of_efficiency, value_of_efficiency, TRUE },
  { N_("Evaporation"), text_of_evaporation, value_of_evaporation, TRUE },
  { N_("Condensation"), text_of_condensation, value_of_condensation, TRUE },
  { N_("Volume ratio"), text_of_ratio, value_of_ratio, TRUE },
  { N_("Exhaust"), text_of_exhaust, NULL, FALSE },
  { N_("Expansion"), text_of_kind, NULL, FALSE },
  { N_("Safety"), text_of_safety, NULL, FALSE },
};

typedef struct { Dialog *self; const Column *column; } Cell;

static void
setup_cb (GtkSignalListItemFactory *factory, GtkListItem *item, const Cell *cell)
{
  GtkWidget *label = gtk_label_new (NULL);
  gtk_label_set_xalign (GTK_LABEL (label), cell->column->is_number ? 1.0f : 0.0f);
  if (cell->column->is_number)
    gtk_widget_add_css_class (label, "numeric");
  gtk_list_item_set_child (item, label);
}

static void
bind_cb (GtkSignalListItemFactory *factory, GtkListItem *item, const Cell *cell)
{
  const HlMediaItem *medium = HL_MEDIA_ITEM (gtk_list_item_get_item (item));
  g_autofree char *text = cell->column->text (cell->self, medium);
  GtkWidget *label = gtk_list_item_get_child (item);
  gtk_label_set_text (GTK_LABEL (label), text);
  if (medium->cycle.possible == HL_CYCLE_POSSIBLE)
    gtk_widget_remove_css_class (label, "quiet");
  else
    gtk_widget_add_css_class (label, "quiet");
}

/* What cannot be stays below what can, whichever way the column is sorted by its first click. */
static int
compare_cb (gconstpointer a, gconstpointer b, gpointer data)
{
  const Cell *cell = data;
  const HlMediaItem *first = a, *second = b;
  if (cell->column->value != NULL)
    {
      double x = cell->column->value (first), y = cell->column->value (second);
      if (isnan (x) || isnan (y))
        return isnan (x) && isnan (y) ? 0 : isnan (x) ? -1 : 1;
      return x < y ? -1 : x > y;
    }
  g_autofree char *x = cell->column->text (cell->self, first), *y = cell->column->text (cell->self, second);
  return g_utf8_collate (x, y);
}

static void
add_columns (Dialog *self)
{
  for (guint k = 0; k < G_N_ELEMENTS (columns); k++)
    {
      GtkListItemFactory *factory = gtk_signal_list_item_factory_new ();
      Cell *cell = g_new (Cell, 1);
      *cell = (Cell) { self, &columns[k] };
      g_signal_connect_data (factory, "setup", G_CALLBACK (setup_cb), cell, NULL, 0);
      g_signal_connect_data (factory, "bind", G_CALLBACK (bind_cb), cell, NULL, 0);
      GtkColumnViewColumn *column = gtk_column_view_column_new (_(columns[k].title), factory);
      GtkSorter *sorter = GTK_SORTER (gtk_custom_sorter_new (compare_cb, cell, g_free));
      gtk_column_view_column_set_sorter (column, sorter);
      gtk_column_view_column_set_resizable (column, TRUE);
      gtk_column_view_column_set_expand (column, k == 0 || k + 3 == G_N_ELEMENTS (columns));
      gtk_column_view_append_column (GTK_COLUMN_VIEW (self->view), column);
      if (k == COLUMN_EFFICIENCY)
        gtk_column_view_sort_by_column (GTK_COLUMN_VIEW (self->view), column, GTK_SORT_DESCENDING);
      g_object_unref (sorter);
      g_object_unref (column);
    }
}

/* --- what is compared --- */

static gboolean
read_temperature (const Dialog *self, GtkWidget *entry, double *T)
{
  g_autoptr (GError) error = NULL;
  gboolean is_good = hl_units_parse (gtk_editable_get_text (GTK_EDITABLE (entry)), HL_DIMENSION_TEMPERATURE, units_of (self), 101325.0, T, &error);
  if (!is_good)
    gtk_label_set_text (GTK_LABEL (self->error), error->message);
  return is_good;
}

static const char *
present_medium (const Dialog *self)
{
  const HlStream *stream = hl_plant_find_stream (hl_session_plant (self->session), self->stream);
  return stream != NULL ? stream->medium : "";
}

static void
select_present (Dialog *self)
{
  GListModel *model = G_LIST_MODEL (self->selection);
  for (guint i = 0; i < g_list_model_get_n_items (model); i++)
    {
      g_autoptr (HlMediaItem) item = g_list_model_get_item (model, i);
      if (g_str_equal (hl_fluid_id (item->fluid), present_medium (self)))
        gtk_single_selection_set_selected (self->selection, i);
    }
}

static void
compare (Dialog *self)
{
  double T_source, T_sink;
  g_auto (GStrv) ids = hl_fluid_list ();

  gtk_label_set_text (GTK_LABEL (self->error), "");
  if (!read_temperature (self, self->source, &T_source) || !read_temperature (self, self->sink, &T_sink))
    return;
  g_list_store_remove_all (self->store);
  for (guint i = 0; ids[i] != NULL; i++)
    {
      g_autoptr (HlMediaItem) item = g_object_new (HL_TYPE_MEDIA_ITEM, NULL);
      item->fluid = hl_fluid_lookup (ids[i]);
      hl_fluid_cycle (item->fluid, T_source, T_sink, &item->cycle);
      g_list_store_append (self->store, item);
    }
  select_present (self);
}

static gboolean
matches_cb (gpointer object, gpointer data)
{
  const Dialog *self = data;
  const HlMediaItem *item = object;
  HlFluidFacts facts;
  g_autofree char *wanted = g_utf8_casefold (gtk_editable_get_text (GTK_EDITABLE (self->search)), -1);
  if (*wanted == '\0')
    return TRUE;
  hl_fluid_facts (item->fluid, &facts);
  g_autofree char *safety = hl_words_of_safety (item->fluid);
  g_autofree char *all = g_strjoin (" ", hl_words_of_fluid (item->fluid), hl_fluid_id (item->fluid), hl_words_of_expansion (facts.expansion), safety,
                                    facts.formula != NULL ? facts.formula : "", NULL);
  g_autofree char *folded = g_utf8_casefold (all, -1);
  return strstr (folded, wanted) != NULL;
}

static void
search_cb (GtkSearchEntry *entry, Dialog *self)
{
  gtk_filter_changed (self->filter, GTK_FILTER_CHANGE_DIFFERENT);
}

/* Hottest and coldest state of the circuit, the approaches of the comparison beyond them. */
static void
temperatures_of_circuit (const Dialog *self, double *T_source, double *T_sink)
{
  HlPlant *plant = hl_session_plant (self->session);
  g_autofree int *circuits = hl_plant_circuits (plant);
  int at = hl_plant_stream_index (plant, self->stream);
  double low = INFINITY, high = 0.0;

  for (guint i = 0; i < hl_plant_n_streams (plant); i++)
    {
      HlStreamResult result;
      if (circuits[i] != circuits[at])
        continue;
      hl_solution_stream (hl_session_solution (self->session), i, &result);
      if (!result.has_state)
        continue;
      low = fmin (low, result.state.T);
      high = fmax (high, result.state.T);
    }
  const double fresh[] = { TEMPERATURES_OF_A_FRESH_CIRCUIT };
  gboolean is_known = high > low + 5.0;
  *T_source = is_known ? high + HL_CYCLE_APPROACH : fresh[0];
  *T_sink = is_known ? low - HL_CYCLE_APPROACH : fresh[1];
}

/* --- choosing --- */

static void
use_selected (Dialog *self)
{
  g_autoptr (GError) error = NULL;
  HlMediaItem *item = gtk_single_selection_get_selected_item (self->selection);

  if (item == NULL)
    return;
  if (hl_medium_apply (self->session, self->stream, hl_fluid_id (item->fluid), &error))
    gtk_window_close (GTK_WINDOW (self->window));
  else
    gtk_label_set_text (GTK_LABEL (self->error), error->message);
}

static void
activate_cb (GtkColumnView *view, guint position, Dialog *self)
{
  use_selected (self);
}

static void
selected_cb (GtkSingleSelection *selection, GParamSpec *pspec, Dialog *self)
{
  HlMediaItem *item = gtk_single_selection_get_selected_item (selection);
  g_autofree char *words = item != NULL ? g_strdup_printf (_("Use %s"), hl_words_of_fluid (item->fluid)) : g_strdup (_("Use"));
  gtk_button_set_label (GTK_BUTTON (self->use), words);
  gtk_widget_set_sensitive (self->use, item != NULL && !g_str_equal (hl_fluid_id (item->fluid), present_medium (self)));
}

/* --- building --- */

static gboolean
close_cb (GtkWidget *window, GVariant *args, gpointer data)
{
  gtk_window_close (GTK_WINDOW (window));
  return TRUE;
}

static void
dialog_free (gpointer data)
{
  Dialog *self = data;
  g_object_unref (self->session);
  g_free (self);
}

static GtkWidget *
temperature_entry (Dialog *self, GtkWidget *box, const char *name, double T)
{
  GtkWidget *label = hl_pane_label (name, "quiet"), *entry = gtk_entry_new ();
  g_autofree char *text = hl_units_format (T, HL_DIMENSION_TEMPERATURE, units_of (self));

  gtk_editable_set_text (GTK_EDITABLE (entry), text);
  gtk_editable_set_width_chars (GTK_EDITABLE (entry), 9);
  gtk_editable_set_max_width_chars (GTK_EDITABLE (entry), 9);
  hl_pane_set_accessible (entry, name, NULL);
  g_signal_connect_swapped (entry, "activate", G_CALLBACK (compare), self);
  gtk_box_append (GTK_BOX (box), label);
  gtk_box_append (GTK_BOX (box), entry);
  return entry;
}

static GtkWidget *
build_head (Dialog *self)
{
  GtkWidget *box = gtk_box_new (GTK_ORIENTATION_HORIZONTAL, 8), *again = gtk_button_new_with_label (_("Compare"));
  double T_source, T_sink;

  temperatures_of_circuit (self, &T_source, &T_sink);
  self->search = gtk_search_entry_new ();
  gtk_widget_set_hexpand (self->search, TRUE);
  hl_pane_set_accessible (self->search, _("Search media"), NULL);
  g_signal_connect (self->search, "search-changed", G_CALLBACK (search_cb), self);
  gtk_box_append (GTK_BOX (box), self->search);
  self->source = temperature_entry (self, box, _("Heat source"), T_source);
  self->sink = temperature_entry (self, box, _("Heat sink"), T_sink);
  g_signal_connect_swapped (again, "clicked", G_CALLBACK (compare), self);
  gtk_box_append (GTK_BOX (box), again);
  return box;
}

static GtkWidget *
build_table (Dialog *self)
{
  GtkWidget *scroll = gtk_scrolled_window_new ();
  GtkFilterListModel *filtered;
  GtkSortListModel *sorted;

  self->store = g_list_store_new (HL_TYPE_MEDIA_ITEM);
  self->filter = GTK_FILTER (gtk_custom_filter_new (matches_cb, self, NULL));
  self->view = gtk_column_view_new (NULL);
  filtered = gtk_filter_list_model_new (G_LIST_MODEL (self->store), self->filter);
  sorted = gtk_sort_list_model_new (G_LIST_MODEL (filtered), g_object_ref (gtk_column_view_get_sorter (GTK_COLUMN_VIEW (self->view))));
  self->selection = gtk_single_selection_new (G_LIST_MODEL (sorted));
  g_signal_connect (self->selection, "notify::selected-item", G_CALLBACK (selected_cb), self);
  gtk_column_view_set_model (GTK_COLUMN_VIEW (self->view), GTK_SELECTION_MODEL (self->selection));
  g_object_unref (self->selection);
  gtk_widget_add_css_class (self->view, "media-table");
  g_signal_connect (self->view, "activate", G_CALLBACK (activate_cb), self);
  add_columns (self);
  gtk_scrolled_window_set_child (GTK_SCROLLED_WINDOW (scroll), self->view);
  gtk_widget_set_vexpand (scroll, TRUE);
  return scroll;
}

static GtkWidget *
build_foot (Dialog *self)
{
  GtkWidget *box = gtk_box_new (GTK_ORIENTATION_HORIZONTAL, 8), *words = gtk_box_new (GTK_ORIENTATION_VERTICAL, 2), *note, *cancel;

  note = hl_pane_label (_("Saturated vapour 10 K below the source, expanded with 0.82, condensed 10 K above the sink, pumped with 0.65; "
                          "no recuperator, no losses. It compares media; it is no medium's best."), "quiet");
  gtk_label_set_wrap (GTK_LABEL (note), TRUE);
  self->error = hl_pane_label ("", "error");
  gtk_label_set_wrap (GTK_LABEL (self->error), TRUE);
  gtk_box_append (GTK_BOX (words), note);
  gtk_box_append (GTK_BOX (words), self->error);
  gtk_widget_set_hexpand (words, TRUE);
  cancel = gtk_button_new_with_label (_("Cancel"));
  g_signal_connect_swapped (cancel, "clicked", G_CALLBACK (gtk_window_close), self->window);
  gtk_widget_add_css_class (self->use, "suggested-action");
  g_signal_connect_swapped (self->use, "clicked", G_CALLBACK (use_selected), self);
  gtk_widget_set_valign (cancel, GTK_ALIGN_END);
  gtk_widget_set_valign (self->use, GTK_ALIGN_END);
  gtk_box_append (GTK_BOX (box), words);
  gtk_box_append (GTK_BOX (box), cancel);
  gtk_box_append (GTK_BOX (box), self->use);
  return box;
}

GtkWidget *
hl_media_dialog_present (GtkWindow *parent, HlSession *session, const char *stream)
{
  Dialog *self = g_new0 (Dialog, 1);
  GtkWidget *box = gtk_box_new (GTK_ORIENTATION_VERTICAL, 10);
  GtkEventController *shortcuts = gtk_shortcut_controller_new ();
  g_autofree char *title = g_strdup_printf (_("Medium of the circuit of stream %s"), stream);

  self->session = g_object_ref (session);
  self->stream = g_intern_string (stream);
  self->window = gtk_window_new ();
  self->use = gtk_button_new_with_label (_("Use"));
  g_object_set_data_full (G_OBJECT (self->window), "hl-media-dialog", self, dialog_free);
  gtk_window_set_title (GTK_WINDOW (self->window), title);
  gtk_window_set_transient_for (GTK_WINDOW (self->window), parent);
  gtk_window_set_modal (GTK_WINDOW (self->window), parent != NULL);
  gtk_window_set_default_size (GTK_WINDOW (self->window), 980, 560);
  gtk_widget_add_css_class (self->window, "heatloom");
  gtk_widget_set_margin_start (box, 14);
  gtk_widget_set_margin_end (box, 14);
  gtk_widget_set_margin_top (box, 14);
  gtk_widget_set_margin_bottom (box, 14);
  gtk_box_append (GTK_BOX (box), build_head (self));
  gtk_box_append (GTK_BOX (box), build_table (self));
  gtk_box_append (GTK_BOX (box), build_foot (self));
  gtk_window_set_child (GTK_WINDOW (self->window), box);
  gtk_shortcut_controller_add_shortcut (GTK_SHORTCUT_CONTROLLER (shortcuts),
    gtk_shortcut_new (gtk_keyval_trigger_new (GDK_KEY_Escape, 0), gtk_callback_action_new (close_cb, NULL, NULL)));
  gtk_widget_add_controller (self->window, shortcuts);
  compare (self);
  selected_cb (self->selection, NULL, self);
  gtk_window_present (GTK_WINDOW (self->window));
  return self->window;
}
