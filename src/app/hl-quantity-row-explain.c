/* How a value came about, and what is known about its quantity: shown under the row when asked for.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "app/hl-quantity-row-private.h"
#include "plant/i18n.h"

#include <math.h>

static void
append_line (GString *text, const char *line_break, char *line)
{
  if (text->len > 0)
    g_string_append (text, line_break);
  g_string_append (text, line);
  g_free (line);
}

static void
append_range (HlQuantityRow *self, GString *text, const char *line_break)
{
  const HlQuantityKind *kind = self->kind;
  HlUnitSet units = hl_pane_units (self->session);

  if (!isfinite (kind->credible_low) || !isfinite (kind->credible_high))
    return;
  g_autofree char *low = hl_quantity_format (kind, kind->credible_low, units);
  g_autofree char *high = hl_quantity_format (kind, kind->credible_high, units);
  append_line (text, line_break, g_strdup_printf (_("Credible from %s to %s"), low, high));
}

char *
hl_quantity_row_help (HlQuantityRow *self, const char *line_break)
{
  const HlPlant *plant = hl_session_plant (self->session);
  const HlQuantityKind *kind = self->kind;
  const HlComponent *owner = self->address.owner == HL_OWNER_COMPONENT ? hl_plant_find_component (plant, self->address.id) : NULL;
  double usual = hl_component_default (owner, kind, self->number);
  const char *source = hl_component_default_source (owner, kind);
  const HlValue *value = hl_quantity_row_value (self);
  HlAddress carrier = hl_quantity_row_carrier (self);
  GString *text = g_string_new (NULL);
  char *difference = hl_quantity_row_difference (self);

  if (difference != NULL)
    append_line (text, line_break, difference);
  if (kind->help != NULL && *kind->help != '\0')
    append_line (text, line_break, g_strdup (_(kind->help)));
  if (value != NULL && value->origin == HL_ORIGIN_TIED)
    {
      g_autofree char *tie = hl_tie_format (plant, &carrier, value);
      append_line (text, line_break, g_strdup_printf (_("Tied: = %s"), tie));
    }
  if (isfinite (usual) && source != NULL && *source != '\0')
    {
      g_autofree char *number = hl_quantity_format (kind, usual, hl_plant_units (plant));
      append_line (text, line_break, g_strdup_printf (_("Default %s: %s"), number, _(source)));
    }
  append_range (self, text, line_break);
  g_autofree char *address = hl_address_to_text (&self->address);
  if (!hl_address_equal (&carrier, &self->address))
    {
      g_autofree char *where = hl_address_to_text (&carrier);
      append_line (text, line_break, g_strdup_printf (_("%s, said at %s"), address, where));
    }
  else
    append_line (text, line_break, g_steal_pointer (&address));
  return g_string_free (text, FALSE);
}

void
hl_quantity_row_add_explanation (HlQuantityRow *self)
{
  self->explanation = gtk_box_new (GTK_ORIENTATION_VERTICAL, 4);
  gtk_widget_add_css_class (self->explanation, "explanation");
  gtk_widget_set_visible (self->explanation, FALSE);
  self->explain_lines = hl_pane_label ("", "lines");
  self->explain_help = hl_pane_label ("", "help");
  GtkWidget *labels[] = { self->explain_lines, self->explain_help };
  for (guint i = 0; i < G_N_ELEMENTS (labels); i++)
    {
      gtk_label_set_wrap (GTK_LABEL (labels[i]), TRUE);
      gtk_label_set_wrap_mode (GTK_LABEL (labels[i]), PANGO_WRAP_WORD_CHAR);
      gtk_label_set_selectable (GTK_LABEL (labels[i]), TRUE);
      gtk_widget_set_focusable (labels[i], FALSE);
      gtk_box_append (GTK_BOX (self->explanation), labels[i]);
    }
  gtk_widget_set_parent (self->explanation, GTK_WIDGET (self));
}

void
hl_quantity_row_update_explanation (HlQuantityRow *self)
{
  HlAddress carrier = hl_quantity_row_carrier (self);
  const HlSolution *solution = hl_session_solution (self->session);
  g_autofree char *lines = hl_solution_explain (solution, &self->address);
  g_autofree char *help = hl_quantity_row_help (self, "\n");

  if (lines == NULL && !hl_address_equal (&carrier, &self->address))
    lines = hl_solution_explain (solution, &carrier);
  gtk_label_set_text (GTK_LABEL (self->explain_lines), lines != NULL ? g_strchomp (lines) : "");
  gtk_widget_set_visible (self->explain_lines, lines != NULL && *lines != '\0');
  gtk_label_set_text (GTK_LABEL (self->explain_help), help);
}

void
hl_quantity_row_show_explanation (HlQuantityRow *self, gboolean shown)
{
  if (shown)
    hl_quantity_row_update_explanation (self);
  gtk_widget_set_visible (self->explanation, shown);
  if (shown)
    gtk_widget_add_css_class (GTK_WIDGET (self), "explained");
  else
    gtk_widget_remove_css_class (GTK_WIDGET (self), "explained");
  gtk_accessible_update_state (GTK_ACCESSIBLE (self->name_button), GTK_ACCESSIBLE_STATE_EXPANDED, shown, -1);
}
