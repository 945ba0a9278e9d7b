/* Rows of the nameplate that choose a medium: that of a circuit, and how water is calculated.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "app/hl-medium-row.h"
#include "app/hl-media-dialog.h"
#include "app/hl-pane.h"
#include "plant/circuit.h"
#include "plant/fluid-words.h"
#include "plant/i18n.h"

#define ROW_DATA "hl-medium-row"

typedef struct {
  HlSession  *session;
  const char *stream;          /* interned */
  GtkWidget  *control, *name, *label, *note;
  gboolean    is_updating;
} Row;

static void
row_free (gpointer data)
{
  Row *row = data;
  g_clear_object (&row->session);
  g_free (row);
}

static Row *
row_of (GtkWidget *widget)
{
  return g_object_get_data (G_OBJECT (widget), ROW_DATA);
}

static GtkWidget *
new_row (HlSession *session, const char *name, Row **row, GtkWidget **line)
{
  GtkWidget *box = gtk_box_new (GTK_ORIENTATION_VERTICAL, 0);

  *row = g_new0 (Row, 1);
  (*row)->session = g_object_ref (session);
  g_object_set_data_full (G_OBJECT (box), ROW_DATA, *row, row_free);
  gtk_widget_add_css_class (box, "pane-row");
  *line = gtk_box_new (GTK_ORIENTATION_HORIZONTAL, 4);
  gtk_widget_add_css_class (*line, "line");
  gtk_box_append (GTK_BOX (box), *line);
  (*row)->name = hl_pane_label (name, "name");
  gtk_label_set_ellipsize (GTK_LABEL ((*row)->name), PANGO_ELLIPSIZE_END);
  gtk_widget_set_hexpand ((*row)->name, TRUE);
  gtk_box_append (GTK_BOX (*line), (*row)->name);
  return box;
}

/* --- the medium of a circuit --- */

gboolean
hl_medium_apply (HlSession *session, const char *stream, const char *medium, GError **error)
{
  HlPlant *plant = hl_session_plant (session), *changed = hl_plant_with_medium (plant, stream, medium, error);

  if (changed == NULL)
    return FALSE;
  if (hl_plant_equal (plant, changed))
    {
      hl_plant_unref (changed);
      return TRUE;
    }
  g_autofree int *circuits = hl_plant_circuits (plant);
  const HlStream *first = hl_plant_stream (plant, (guint) circuits[hl_plant_stream_index (plant, stream)]);
  g_autofree char *step = g_strdup_printf (_("Change Medium of Circuit %s"), first->id);
  hl_session_apply (session, step, changed, NULL, FALSE);
  return TRUE;
}

static void
choose_cb (GtkButton *button, Row *row)
{
  GtkRoot *root = gtk_widget_get_root (GTK_WIDGET (button));
  if (row->stream != NULL && hl_plant_find_stream (hl_session_plant (row->session), row->stream) != NULL)
    hl_media_dialog_present (GTK_IS_WINDOW (root) ? GTK_WINDOW (root) : NULL, row->session, row->stream);
}

GtkWidget *
hl_medium_row_new (HlSession *session)
{
  Row *row;
  GtkWidget *line, *box = new_row (session, _("Medium"), &row, &line);

  row->control = gtk_button_new ();
  row->label = gtk_label_new (NULL);
  gtk_label_set_ellipsize (GTK_LABEL (row->label), PANGO_ELLIPSIZE_END);
  gtk_button_set_child (GTK_BUTTON (row->control), row->label);
  gtk_widget_add_css_class (row->control, "option");
  gtk_widget_set_valign (row->control, GTK_ALIGN_CENTER);
  g_signal_connect (row->control, "clicked", G_CALLBACK (choose_cb), row);
  gtk_box_append (GTK_BOX (line), row->control);
  row->note = hl_pane_label ("", "quiet");
  gtk_label_set_ellipsize (GTK_LABEL (row->note), PANGO_ELLIPSIZE_END);
  gtk_widget_set_margin_start (row->note, 7);
  gtk_widget_set_margin_bottom (row->note, 5);
  gtk_box_append (GTK_BOX (box), row->note);
  return box;
}

/* "dry · A3 · to 426.9 °C" */
static char *
note_of (const HlFluid *fluid, HlUnitSet units)
{
  HlFluidFacts facts;
  HlFluidLimits limits;

  hl_fluid_facts (fluid, &facts);
  hl_fluid_limits (fluid, &limits);
  g_autofree char *safety = hl_words_of_safety (fluid);
  if (!hl_fluid_has_dome (fluid))
    return g_strdup (hl_words_of_expansion (facts.expansion));
  g_autofree char *critical = hl_units_format (limits.T_critical, HL_DIMENSION_TEMPERATURE, units);
  return g_strdup_printf (_("%s · safety %s · critical %s"), hl_words_of_expansion (facts.expansion), safety, critical);
}

void
hl_medium_row_set (GtkWidget *box, const char *name, const char *stream)
{
  Row *row = row_of (box);
  HlPlant *plant = hl_session_plant (row->session);
  const HlStream *at = hl_plant_find_stream (plant, stream);
  const HlFluid *fluid = at != NULL ? hl_plant_fluid (plant, at->medium) : NULL;

  row->stream = g_intern_string (stream);
  gtk_label_set_text (GTK_LABEL (row->name), name);
  if (fluid == NULL)
    return;
  g_autofree char *note = note_of (fluid, hl_plant_units (plant));
  gtk_label_set_text (GTK_LABEL (row->label), hl_words_of_fluid (fluid));
  gtk_label_set_text (GTK_LABEL (row->note), note);
  gtk_widget_set_tooltip_text (row->control, hl_fluid_formulation (fluid));
  hl_pane_set_accessible (row->control, name, hl_words_of_fluid (fluid));
}

/* --- how water is calculated --- */

static void
formulation_changed_cb (GtkDropDown *drop, GParamSpec *pspec, Row *row)
{
  HlPlant *plant = hl_session_plant (row->session);
  guint n, chosen = gtk_drop_down_get_selected (drop);
  const HlFormulation *list = hl_formulations (&n);

  if (!row->is_updating && chosen < n && !g_str_equal (list[chosen].id, hl_plant_formulation (plant)))
    hl_session_apply (row->session, _("Change the formulation of water"), hl_plant_with_formulation (plant, list[chosen].id), NULL, FALSE);
}

GtkWidget *
hl_formulation_row_new (HlSession *session)
{
  Row *row;
  GtkWidget *line, *box = new_row (session, _("Water by"), &row, &line);
  GtkStringList *words = gtk_string_list_new (NULL);
  guint n;
  const HlFormulation *list = hl_formulations (&n);

  for (guint i = 0; i < n; i++)
    gtk_string_list_append (words, _(list[i].name));
  row->control = gtk_drop_down_new (G_LIST_MODEL (words), NULL);
  gtk_widget_add_css_class (row->control, "option");
  gtk_widget_set_valign (row->control, GTK_ALIGN_CENTER);
  gtk_widget_set_tooltip_text (row->control, _("IAPWS-IF97 is quick and usual in industry; IAPWS-95 is the scientific formulation it follows."));
  hl_pane_set_accessible (row->control, _("Water by"), NULL);
  g_signal_connect (row->control, "notify::selected", G_CALLBACK (formulation_changed_cb), row);
  gtk_box_append (GTK_BOX (line), row->control);
  hl_formulation_row_update (box);
  return box;
}

void
hl_formulation_row_update (GtkWidget *box)
{
  Row *row = row_of (box);
  guint n;
  const HlFormulation *list = hl_formulations (&n);

  row->is_updating = TRUE;
  for (guint i = 0; i < n; i++)
    if (g_str_equal (list[i].id, hl_plant_formulation (hl_session_plant (row->session))))
      gtk_drop_down_set_selected (GTK_DROP_DOWN (row->control), i);
  row->is_updating = FALSE;
}
