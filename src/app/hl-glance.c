/* The card of key results.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "app/hl-glance.h"
#include "app/compat.h"
#include "app/hl-pane.h"
#include "plant/i18n.h"

#include <math.h>

#define CARD_WIDTH 216

struct _HlGlance {
  GtkWidget  parent_instance;
  HlSession *session;
  GtkWidget *card, *title, *remark, *scroller, *grid;
  GPtrArray *keys;              /* interned: the results whose labels stand in the grid, in order */
};

G_DEFINE_FINAL_TYPE (HlGlance, hl_glance, GTK_TYPE_WIDGET)

/* The present solution; where it failed the last good one, shown grey. */
static HlSolution *
shown_solution (HlGlance *self, gboolean *is_stale)
{
  HlSolution *solution = hl_session_solution (self->session), *good = hl_session_last_good (self->session);

  *is_stale = !hl_solution_is_solved (solution) && good != NULL;
  return *is_stale ? good : solution;
}

/* What a review asks first; the other results follow in their own order. */
static const char *const first_keys[] = {
  "net_power", "gross_power", "heat_delivered", "net_efficiency_lhv", "cycle_efficiency", "utilisation", "exergy_efficiency",
  "fuel_heat", "heat_input", "heat_rejected", "heat_rate", "steam_rate", "exhaust_moisture", "own_consumption",
};

typedef struct { const HlQuantityKind *kind; double value; } Result;

static int
rank (const char *key)
{
  for (guint n = 0; n < G_N_ELEMENTS (first_keys); n++)
    if (strcmp (key, first_keys[n]) == 0)
      return (int) n;
  return G_N_ELEMENTS (first_keys);
}

static int
compare_results (gconstpointer a, gconstpointer b)
{
  const Result *x = a, *y = b;
  int difference = rank (x->kind->key) - rank (y->kind->key);
  return difference != 0 ? difference : x->kind < y->kind ? -1 : 1;       /* one table holds all kinds */
}

/* Other consumption is said only where there is some. */
static gboolean
is_worth_a_line (const HlQuantityKind *kind, double value)
{
  return !g_str_has_prefix (kind->key, "other_consumption") || fabs (value) > 0.0;
}

static GArray *
results_to_show (const HlSolution *solution)
{
  GArray *results = g_array_new (FALSE, FALSE, sizeof (Result));

  for (guint n = 0; n < hl_solution_n_results (solution); n++)
    {
      Result result;
      result.kind = hl_solution_result (solution, n, &result.value);
      if (is_worth_a_line (result.kind, result.value))
        g_array_append_val (results, result);
    }
  g_array_sort (results, compare_results);
  return results;
}

static gboolean
same_keys (HlGlance *self, const GArray *results)
{
  if (results->len != self->keys->len)
    return FALSE;
  for (guint i = 0; i < results->len; i++)
    if (g_ptr_array_index (self->keys, i) != g_array_index (results, Result, i).kind->key)
      return FALSE;
  return TRUE;
}

static void
rebuild (HlGlance *self, const GArray *results)
{
  GtkWidget *child;

  while ((child = gtk_widget_get_first_child (self->grid)) != NULL)
    gtk_grid_remove (GTK_GRID (self->grid), child);
  g_ptr_array_set_size (self->keys, 0);
  for (guint i = 0; i < results->len; i++)
    {
      const HlQuantityKind *kind = g_array_index (results, Result, i).kind;
      GtkWidget *name = hl_pane_label (_(kind->name), "name"), *number = gtk_label_new ("");
      g_ptr_array_add (self->keys, (gpointer) kind->key);
      gtk_label_set_ellipsize (GTK_LABEL (name), PANGO_ELLIPSIZE_END);
      gtk_widget_set_hexpand (name, TRUE);
      gtk_label_set_xalign (GTK_LABEL (number), 1.0f);
      gtk_widget_add_css_class (number, "number");
      if (kind->help != NULL)
        hl_compat_set_tip (name, _(kind->help));
      gtk_grid_attach (GTK_GRID (self->grid), name, 0, (int) i, 1, 1);
      gtk_grid_attach (GTK_GRID (self->grid), number, 1, (int) i, 1, 1);
    }
}

static void
update (HlGlance *self)
{
  gboolean is_stale;
  HlSolution *solution = shown_solution (self, &is_stale);
  HlUnitSet units = hl_pane_units (self->session);
  g_autoptr (GArray) results = results_to_show (solution);
  guint n = results->len;

  if (!same_keys (self, results))
    rebuild (self, results);
  for (guint i = 0; i < n; i++)
    {
      Result result = g_array_index (results, Result, i);
      GtkWidget *number = gtk_grid_get_child_at (GTK_GRID (self->grid), 1, (int) i);
      g_autofree char *text = hl_quantity_format (result.kind, result.value, units);
      gtk_label_set_text (GTK_LABEL (number), text);
      hl_pane_set_accessible (number, _(result.kind->name), text);
    }
  gtk_label_set_text (GTK_LABEL (self->remark), n == 0 ? _("Results appear here as soon as the plant solves.")
                                                       : _("of the last plant that solved"));
  gtk_widget_set_visible (self->remark, is_stale || n == 0);
  gtk_widget_set_visible (self->scroller, n > 0);
  if (is_stale)
    gtk_widget_add_css_class (GTK_WIDGET (self), "stale");
  else
    gtk_widget_remove_css_class (GTK_WIDGET (self), "stale");
}

static void
hl_glance_dispose (GObject *object)
{
  HlGlance *self = HL_GLANCE (object);
  GtkWidget *child;

  if (self->session != NULL)
    g_signal_handlers_disconnect_by_data (self->session, self);
  while ((child = gtk_widget_get_first_child (GTK_WIDGET (self))) != NULL)
    gtk_widget_unparent (child);
  g_clear_object (&self->session);
  g_clear_pointer (&self->keys, g_ptr_array_unref);
  G_OBJECT_CLASS (hl_glance_parent_class)->dispose (object);
}

static void
hl_glance_class_init (HlGlanceClass *klass)
{
  GtkWidgetClass *widget_class = GTK_WIDGET_CLASS (klass);
  G_OBJECT_CLASS (klass)->dispose = hl_glance_dispose;
  gtk_widget_class_set_layout_manager_type (widget_class, GTK_TYPE_BOX_LAYOUT);
  gtk_widget_class_set_css_name (widget_class, "glance");
  gtk_widget_class_set_accessible_role (widget_class, GTK_ACCESSIBLE_ROLE_GROUP);
}

static void
hl_glance_init (HlGlance *self)
{
  gtk_orientable_set_orientation (GTK_ORIENTABLE (gtk_widget_get_layout_manager (GTK_WIDGET (self))), GTK_ORIENTATION_VERTICAL);
  self->keys = g_ptr_array_new ();
  self->card = gtk_box_new (GTK_ORIENTATION_VERTICAL, 0);
  gtk_widget_add_css_class (self->card, "card");
  gtk_widget_set_valign (self->card, GTK_ALIGN_START);
  gtk_widget_set_vexpand (self->card, TRUE);
  gtk_widget_set_parent (self->card, GTK_WIDGET (self));
  self->title = hl_pane_label (_("At a glance"), "title");
  gtk_box_append (GTK_BOX (self->card), self->title);
  self->remark = hl_pane_label ("", "quiet");
  gtk_label_set_wrap (GTK_LABEL (self->remark), TRUE);
  gtk_box_append (GTK_BOX (self->card), self->remark);
  self->grid = gtk_grid_new ();
  gtk_grid_set_column_spacing (GTK_GRID (self->grid), 0);
  self->scroller = gtk_scrolled_window_new ();
  gtk_scrolled_window_set_policy (GTK_SCROLLED_WINDOW (self->scroller), GTK_POLICY_NEVER, GTK_POLICY_AUTOMATIC);
  gtk_scrolled_window_set_child (GTK_SCROLLED_WINDOW (self->scroller), self->grid);
  gtk_scrolled_window_set_propagate_natural_height (GTK_SCROLLED_WINDOW (self->scroller), TRUE);
  gtk_scrolled_window_set_propagate_natural_width (GTK_SCROLLED_WINDOW (self->scroller), TRUE);
  gtk_box_append (GTK_BOX (self->card), self->scroller);
  gtk_widget_set_size_request (GTK_WIDGET (self), CARD_WIDTH, -1);
  gtk_widget_set_hexpand (GTK_WIDGET (self), FALSE);        /* spare room is the neighbour's */
  hl_pane_set_accessible (GTK_WIDGET (self), _("At a glance"), _("Key results of the plant"));
}

GtkWidget *
hl_glance_new (HlSession *session)
{
  HlGlance *self = g_object_new (HL_TYPE_GLANCE, NULL);

  self->session = g_object_ref (session);
  g_signal_connect_swapped (session, "changed", G_CALLBACK (update), self);
  update (self);
  return GTK_WIDGET (self);
}
