/* Rows of the nameplate that are not quantities: options, the site, units, links and limits.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "app/compat.h"
#include "app/hl-appearance.h"
#include "app/hl-nameplate-private.h"
#include "app/hl-pane.h"
#include "app/hl-trace.h"
#include "plant/i18n.h"

#include <math.h>

#define ROW_DATA "hl-row"

typedef struct {
  HlSession          *session;
  const char         *id;            /* interned: component of an option, target of a link */
  const HlOptionKind *option;
  HlSiteNumber        site;
  GtkWidget          *control, *name, *unit, *note;
  char               *shown;
  gboolean            is_updating;
  double              value, caution, warning;      /* of a limit */
} Row;

static void
row_free (gpointer data)
{
  Row *row = data;
  g_clear_object (&row->session);
  g_free (row->shown);
  g_free (row);
}

static Row *
row_of (GtkWidget *widget)
{
  return g_object_get_data (G_OBJECT (widget), ROW_DATA);
}

/* A box that looks like a quantity's row: an optional name, and a note under it. */
static GtkWidget *
new_row (HlSession *session, const char *name, Row **row, GtkWidget **line)
{
  GtkWidget *box = gtk_box_new (GTK_ORIENTATION_VERTICAL, 0);

  *row = g_new0 (Row, 1);
  (*row)->session = session != NULL ? g_object_ref (session) : NULL;
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

/* A bar at the side where the row differs from what the plant is marked against, and the words for it on hover; takes @there. */
static void
mark_difference (GtkWidget *box, const char *reference, char *there)
{
  g_autofree char *tip = there != NULL ? g_strdup_printf (_("%s: %s"), reference, there) : NULL;

  if (there != NULL)
    gtk_widget_add_css_class (box, "differs");
  else
    gtk_widget_remove_css_class (box, "differs");
  hl_compat_set_tip (box, tip);
  g_free (there);
}

/* --- options --- */

static char *
option_words (const HlOptionKind *option, int value)
{
  return option->choices != NULL ? g_strdup (_(option->choice_names[value])) : g_strdup_printf ("%d", value);
}

static void
mark_option (GtkWidget *box, Row *row, const HlComponent *component)
{
  const char *name = NULL;
  const HlPlant *reference = hl_session_reference (row->session, &name);
  const HlComponent *other = reference != NULL ? hl_plant_find_component (reference, row->id) : NULL;
  gboolean differs = other != NULL && other->kind == component->kind
                     && hl_component_option (other, row->option->key) != hl_component_option (component, row->option->key);

  mark_difference (box, name, differs ? option_words (row->option, hl_component_option (other, row->option->key)) : NULL);
}

static void
set_option (Row *row, int value)
{
  HlPlant *plant = hl_session_plant (row->session);
  const HlComponent *component = hl_plant_find_component (plant, row->id);

  if (row->is_updating || component == NULL || hl_component_option (component, row->option->key) == value)
    return;
  g_autofree char *step = g_strdup_printf (_("%s of %s"), _(row->option->name), row->id);
  HlComponent *copy = hl_component_copy (component);
  hl_component_set_option (copy, row->option->key, value);
  hl_session_apply (row->session, step, hl_plant_with_component (plant, copy), NULL, TRUE);
}

static void
count_changed_cb (GtkSpinButton *spin, Row *row)
{
  set_option (row, gtk_spin_button_get_value_as_int (spin));
}

static void
choice_changed_cb (GtkDropDown *drop, GParamSpec *pspec, Row *row)
{
  set_option (row, (int) gtk_drop_down_get_selected (drop));
}

static GtkWidget *
choice_control (const HlOptionKind *option)
{
  GtkStringList *list = gtk_string_list_new (NULL);

  for (int n = 0; option->choices[n] != NULL; n++)
    gtk_string_list_append (list, _(option->choice_names[n]));
  return gtk_drop_down_new (G_LIST_MODEL (list), NULL);
}

GtkWidget *
hl_option_row_new (HlSession *session, const char *id, const HlOptionKind *option)
{
  Row *row;
  GtkWidget *line, *box = new_row (session, _(option->name), &row, &line);

  row->id = id;
  row->option = option;
  if (option->choices != NULL)
    {
      row->control = choice_control (option);
      g_signal_connect (row->control, "notify::selected", G_CALLBACK (choice_changed_cb), row);
    }
  else
    {
      row->control = gtk_spin_button_new_with_range (option->least, option->most, 1.0);
      gtk_editable_set_width_chars (GTK_EDITABLE (row->control), 3);
      gtk_editable_set_alignment (GTK_EDITABLE (row->control), 1.0f);
      g_signal_connect (row->control, "value-changed", G_CALLBACK (count_changed_cb), row);
    }
  g_object_set_data_full (G_OBJECT (row->control), HL_OPTION_NAME, g_strdup_printf ("%s.%s", id, option->key), g_free);
  gtk_widget_add_css_class (row->control, "option");
  gtk_widget_set_valign (row->control, GTK_ALIGN_CENTER);
  hl_pane_set_accessible (row->control, _(option->name), id);
  gtk_box_append (GTK_BOX (line), row->control);
  hl_option_row_update (box);
  return box;
}

void
hl_option_row_update (GtkWidget *widget)
{
  Row *row = row_of (widget);
  const HlComponent *component = hl_plant_find_component (hl_session_plant (row->session), row->id);

  if (component == NULL)
    return;
  int value = hl_component_option (component, row->option->key);
  row->is_updating = TRUE;
  if (row->option->choices != NULL)
    gtk_drop_down_set_selected (GTK_DROP_DOWN (row->control), (guint) value);
  else
    gtk_spin_button_set_value (GTK_SPIN_BUTTON (row->control), value);
  row->is_updating = FALSE;
  mark_option (widget, row, component);
}

/* --- the site --- */

static const struct { const char *name; HlDimension dimension; gsize offset; const char *help; } site_numbers[HL_N_SITE_NUMBERS] = {
  { N_("Altitude"), HL_DIMENSION_LENGTH, G_STRUCT_OFFSET (HlSite, altitude), N_("Sets the ambient pressure, and with it what gauge pressures mean") },
  { N_("Ambient temperature"), HL_DIMENSION_TEMPERATURE, G_STRUCT_OFFSET (HlSite, ambient_T), N_("Dry-bulb temperature of the air") },
  { N_("Wet-bulb temperature"), HL_DIMENSION_TEMPERATURE, G_STRUCT_OFFSET (HlSite, wet_bulb_T), N_("Limits what a wet cooling tower can reach") },
  { N_("Dead state temperature"), HL_DIMENSION_TEMPERATURE, G_STRUCT_OFFSET (HlSite, dead_T), N_("Temperature at which exergy counts as nothing") },
  { N_("Dead state pressure"), HL_DIMENSION_PRESSURE, G_STRUCT_OFFSET (HlSite, dead_p), N_("Pressure at which exergy counts as nothing") },
};

static double *
site_number (HlSite *site, HlSiteNumber which)
{
  return (double *) ((char *) site + site_numbers[which].offset);
}

static void
site_note (Row *row, const char *text)
{
  gtk_label_set_text (GTK_LABEL (row->note), text != NULL ? text : "");
  gtk_widget_set_visible (row->note, text != NULL);
  if (text != NULL)
    gtk_widget_add_css_class (row->control, "error");
  else
    gtk_widget_remove_css_class (row->control, "error");
}

/* Bounds of the standard atmosphere's troposphere, and of the air on earth. */
static gboolean
site_number_is_credible (HlSiteNumber which, double si, GError **error)
{
  gboolean is_good = TRUE;

  if (which == HL_SITE_ALTITUDE)
    is_good = si >= -500.0 && si <= 11000.0;
  else if (site_numbers[which].dimension == HL_DIMENSION_TEMPERATURE)
    is_good = si > 180.0 && si < 340.0;
  else
    is_good = si > 1.0e4 && si < 2.0e5;
  if (!is_good)
    g_set_error (error, HL_PLANT_ERROR, HL_PLANT_ERROR_OUT_OF_RANGE, _("%s of a site lies between %s"), _(site_numbers[which].name),
                 which == HL_SITE_ALTITUDE ? _("-500 and 11000 m")
                 : site_numbers[which].dimension == HL_DIMENSION_TEMPERATURE ? _("-93 and 67 °C") : _("0.1 and 2 bar"));
  return is_good;
}

static void
commit_site (Row *row)
{
  HlPlant *plant = hl_session_plant (row->session);
  const char *text = gtk_editable_get_text (GTK_EDITABLE (row->control));
  g_autoptr (GError) error = NULL;
  HlSite site = *hl_plant_site (plant);
  double si;

  if (g_strcmp0 (text, row->shown) == 0)
    return;
  if (!hl_units_parse (text, site_numbers[row->site].dimension, hl_plant_units (plant), hl_plant_site_pressure (plant), &si, &error)
      || !site_number_is_credible (row->site, si, &error))
    {
      site_note (row, error->message);
      return;
    }
  g_autofree char *step = g_strdup_printf (_("Change %s"), _(site_numbers[row->site].name));
  *site_number (&site, row->site) = si;
  site_note (row, NULL);
  g_free (row->shown);
  row->shown = g_strdup (text);
  hl_session_apply (row->session, step, hl_plant_with_site (plant, &site), NULL, FALSE);
}

static void
site_activate_cb (GtkEntry *entry, Row *row)
{
  commit_site (row);
}

static void
site_leave_cb (GtkEventControllerFocus *controller, Row *row)
{
  commit_site (row);
}

static gboolean
site_key_cb (GtkEventControllerKey *controller, guint key, guint code, GdkModifierType state, GtkWidget *box)
{
  Row *row = row_of (box);

  if (key != GDK_KEY_Escape || g_strcmp0 (gtk_editable_get_text (GTK_EDITABLE (row->control)), row->shown) == 0)
    return GDK_EVENT_PROPAGATE;
  site_note (row, NULL);
  gtk_editable_set_text (GTK_EDITABLE (row->control), row->shown);
  hl_site_row_update (box);
  return GDK_EVENT_STOP;
}

GtkWidget *
hl_site_row_new (HlSession *session, HlSiteNumber which)
{
  Row *row;
  GtkWidget *line, *box = new_row (session, _(site_numbers[which].name), &row, &line);
  GtkEventController *focus = gtk_event_controller_focus_new (), *keys = gtk_event_controller_key_new ();

  row->site = which;
  row->shown = g_strdup ("");
  row->control = gtk_entry_new ();
  gtk_editable_set_alignment (GTK_EDITABLE (row->control), 1.0f);
  gtk_editable_set_width_chars (GTK_EDITABLE (row->control), 9);
  gtk_editable_set_max_width_chars (GTK_EDITABLE (row->control), 9);
  hl_pane_set_accessible (row->control, _(site_numbers[which].name), _(site_numbers[which].help));
  g_signal_connect (row->control, "activate", G_CALLBACK (site_activate_cb), row);
  g_signal_connect (focus, "leave", G_CALLBACK (site_leave_cb), row);
  gtk_widget_add_controller (row->control, focus);
  gtk_event_controller_set_propagation_phase (keys, GTK_PHASE_CAPTURE);
  g_signal_connect (keys, "key-pressed", G_CALLBACK (site_key_cb), box);
  gtk_widget_add_controller (row->control, keys);
  gtk_box_append (GTK_BOX (line), row->control);
  row->unit = hl_pane_label ("", "unit");
  gtk_label_set_width_chars (GTK_LABEL (row->unit), 3);
  gtk_box_append (GTK_BOX (line), row->unit);
  row->note = hl_pane_label ("", "note");
  gtk_widget_add_css_class (row->note, "error");
  gtk_label_set_wrap (GTK_LABEL (row->note), TRUE);
  gtk_widget_set_visible (row->note, FALSE);
  gtk_box_append (GTK_BOX (box), row->note);
  hl_site_row_update (box);
  return box;
}

static void
mark_site (GtkWidget *box, Row *row)
{
  const char *name = NULL;
  const HlPlant *plant = hl_session_plant (row->session), *reference = hl_session_reference (row->session, &name);
  HlSite here = *hl_plant_site (plant), there = reference != NULL ? *hl_plant_site (reference) : here;
  double number = *site_number (&there, row->site);
  gboolean differs = memcmp (&number, site_number (&here, row->site), sizeof number) != 0;

  mark_difference (box, name, differs ? hl_units_format (number, site_numbers[row->site].dimension, hl_plant_units (plant)) : NULL);
  if (!differs)
    hl_compat_set_tip (box, _(site_numbers[row->site].help));
}

void
hl_site_row_update (GtkWidget *box)
{
  Row *row = row_of (box);
  const HlPlant *plant = hl_session_plant (row->session);
  HlSite site = *hl_plant_site (plant);
  HlDimension dimension = site_numbers[row->site].dimension;

  gtk_label_set_text (GTK_LABEL (row->unit), hl_units_label (dimension, hl_plant_units (plant)));
  mark_site (box, row);
  if (g_strcmp0 (gtk_editable_get_text (GTK_EDITABLE (row->control)), row->shown) != 0)
    return;                                        /* being typed */
  g_free (row->shown);
  row->shown = hl_units_format_number (*site_number (&site, row->site), dimension, hl_plant_units (plant));
  gtk_editable_set_text (GTK_EDITABLE (row->control), row->shown);
}

/* --- units --- */

static const char *const unit_set_names[HL_N_UNIT_SETS] = {
  [HL_UNITS_METRIC] = N_("Metric: bar, °C, kg/s"),
  [HL_UNITS_SI] = N_("SI: Pa, K, kg/s"),
  [HL_UNITS_US] = N_("US: psi, °F, lb/h"),
};

static void
units_changed_cb (GtkDropDown *drop, GParamSpec *pspec, Row *row)
{
  HlPlant *plant = hl_session_plant (row->session);
  HlUnitSet units = (HlUnitSet) gtk_drop_down_get_selected (drop);

  if (!row->is_updating && units < HL_N_UNIT_SETS && units != hl_plant_units (plant))
    hl_session_apply (row->session, _("Change the units"), hl_plant_with_units (plant, units), NULL, FALSE);
}

GtkWidget *
hl_units_row_new (HlSession *session)
{
  Row *row;
  GtkWidget *line, *box = new_row (session, _("Units"), &row, &line);
  GtkStringList *list = gtk_string_list_new (NULL);

  for (int n = 0; n < HL_N_UNIT_SETS; n++)
    gtk_string_list_append (list, _(unit_set_names[n]));
  row->control = gtk_drop_down_new (G_LIST_MODEL (list), NULL);
  gtk_widget_add_css_class (row->control, "option");
  gtk_widget_set_valign (row->control, GTK_ALIGN_CENTER);
  hl_pane_set_accessible (row->control, _("Units"), NULL);
  g_signal_connect (row->control, "notify::selected", G_CALLBACK (units_changed_cb), row);
  gtk_box_append (GTK_BOX (line), row->control);
  hl_units_row_update (box);
  return box;
}

void
hl_units_row_update (GtkWidget *box)
{
  Row *row = row_of (box);
  row->is_updating = TRUE;
  gtk_drop_down_set_selected (GTK_DROP_DOWN (row->control), hl_pane_units (row->session));
  row->is_updating = FALSE;
}

/* --- links --- */

static void
link_clicked_cb (GtkButton *button, Row *row)
{
  if (row->id != NULL)
    hl_session_select (row->session, row->id, FALSE);
}

GtkWidget *
hl_link_row_new (HlSession *session, gboolean is_tall)
{
  Row *row;
  GtkWidget *line, *box = new_row (session, "", &row, &line), *button = gtk_button_new ();

  /* The whole line is the button. */
  g_object_ref (line);
  gtk_box_remove (GTK_BOX (box), line);
  gtk_button_set_child (GTK_BUTTON (button), line);
  g_object_unref (line);
  gtk_button_set_has_frame (GTK_BUTTON (button), FALSE);
  gtk_widget_add_css_class (button, "link-line");
  g_signal_connect (button, "clicked", G_CALLBACK (link_clicked_cb), row);
  gtk_box_append (GTK_BOX (box), button);
  row->control = button;
  row->unit = hl_pane_label ("", "detail");
  gtk_label_set_ellipsize (GTK_LABEL (row->unit), PANGO_ELLIPSIZE_END);
  gtk_label_set_xalign (GTK_LABEL (row->unit), is_tall ? 0.0f : 1.0f);
  gtk_box_append (GTK_BOX (line), row->unit);
  if (is_tall)
    {
      gtk_orientable_set_orientation (GTK_ORIENTABLE (line), GTK_ORIENTATION_VERTICAL);
      gtk_box_set_spacing (GTK_BOX (line), 0);
      gtk_widget_add_css_class (line, "tall");
    }
  return box;
}

void
hl_link_row_set (GtkWidget *box, const char *name, const char *text, const char *id)
{
  Row *row = row_of (box);

  row->id = id;
  if (strcmp (gtk_label_get_text (GTK_LABEL (row->name)), name) == 0 && strcmp (gtk_label_get_text (GTK_LABEL (row->unit)), text) == 0)
    return;
  gtk_label_set_text (GTK_LABEL (row->name), name);
  gtk_label_set_text (GTK_LABEL (row->unit), text);
  gtk_widget_set_sensitive (row->control, id != NULL);
  hl_pane_set_accessible (row->control, name, text);
}

/* --- limits --- */

#define LIMIT_WIDTH 96
#define LIMIT_HEIGHT 8

/* The bar spans one and a third of the warning limit; ticks at both limits, filled up to the value. */
static void
draw_limit_cb (GtkDrawingArea *area, cairo_t *cr, int width, int height, gpointer data)
{
  Row *row = data;
  const HlTheme *theme = hl_appearance_theme ();
  double full = row->warning * 4.0 / 3.0;
  double filled = CLAMP (row->value / full, 0.0, 1.0) * width, y = height / 2.0;
  const HlColour *colour = row->value > row->warning ? &theme->warning : row->value > row->caution ? &theme->caution : &theme->good;

  cairo_set_line_cap (cr, CAIRO_LINE_CAP_ROUND);
  cairo_set_line_width (cr, 5.0);
  hl_set_colour (cr, &theme->hairline);
  cairo_move_to (cr, 3.0, y);
  cairo_line_to (cr, width - 3.0, y);
  cairo_stroke (cr);
  if (filled > 3.0)
    {
      hl_set_colour (cr, colour);
      cairo_move_to (cr, 3.0, y);
      cairo_line_to (cr, MAX (3.1, filled - 3.0), y);
      cairo_stroke (cr);
    }
  hl_set_colour (cr, &theme->ink);
  cairo_set_line_width (cr, 1.0);
  cairo_set_line_cap (cr, CAIRO_LINE_CAP_BUTT);
  for (int n = 0; n < 2; n++)
    {
      double x = floor ((n == 0 ? row->caution : row->warning) / full * width) + 0.5;
      cairo_move_to (cr, x, 0.0);
      cairo_line_to (cr, x, height);
      cairo_stroke (cr);
    }
}

GtkWidget *
hl_limit_row_new (void)
{
  Row *row;
  GtkWidget *line, *box = new_row (NULL, "", &row, &line);

  row->control = gtk_drawing_area_new ();
  gtk_widget_set_size_request (row->control, LIMIT_WIDTH, LIMIT_HEIGHT + 4);
  gtk_widget_set_valign (row->control, GTK_ALIGN_CENTER);
  gtk_drawing_area_set_draw_func (GTK_DRAWING_AREA (row->control), draw_limit_cb, row, NULL);
  gtk_box_append (GTK_BOX (line), row->control);
  row->note = hl_pane_label ("", "note");
  gtk_box_append (GTK_BOX (box), row->note);
  return box;
}

void
hl_limit_row_set (GtkWidget *box, const char *name, double value, double caution, double warning)
{
  Row *row = row_of (box);
  g_autofree char *title = g_strdup_printf ("%s %.1f %%", name, 100.0 * value);
  g_autofree char *note = g_strdup_printf (_("caution above %.0f %%, warning above %.0f %%"), 100.0 * caution, 100.0 * warning);

  row->value = value;
  row->caution = caution;
  row->warning = warning;
  gtk_label_set_text (GTK_LABEL (row->name), title);
  gtk_label_set_text (GTK_LABEL (row->note), note);
  hl_pane_set_accessible (row->control, title, note);
  gtk_widget_queue_draw (row->control);
}
