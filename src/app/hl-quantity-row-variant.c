/* A quantity that differs from the base, or from what the plant is compared with: its mark, and the way back.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "app/hl-quantity-row-private.h"
#include "plant/i18n.h"

static const HlPlant *
reference (HlQuantityRow *self, const char **name)
{
  const HlPlant *plant = hl_session_reference (self->session, name);
  return plant != NULL && hl_plant_differs_at (plant, hl_session_plant (self->session), &self->address) ? plant : NULL;
}

/* "0.07000 bar, given"; "found" where the reference finds it. */
static char *
shown_there (HlQuantityRow *self, const HlPlant *there)
{
  const HlValue *value = hl_plant_value_wherever (there, &self->address, NULL);
  g_autofree char *number = NULL;
  if (value == NULL)
    return g_strdup (hl_origin_name (HL_ORIGIN_FOUND));
  if (value->origin == HL_ORIGIN_TIED)
    {
      g_autofree char *tie = hl_tie_format (there, &self->address, value);
      return g_strdup_printf ("= %s", tie);
    }
  number = hl_quantity_format (self->kind, value->value, hl_plant_units (there));
  return g_strdup_printf ("%s, %s", number, hl_origin_name (value->origin));
}

char *
hl_quantity_row_difference (HlQuantityRow *self)
{
  const char *name = NULL;
  const HlPlant *there = reference (self, &name);
  g_autofree char *shown = there != NULL ? shown_there (self, there) : NULL;
  /* Translators: a variant and the value in it, "Base: 0.07000 bar, given" */
  return shown != NULL ? g_strdup_printf (_("%s: %s"), name, shown) : NULL;
}

void
hl_quantity_row_update_variant (HlQuantityRow *self)
{
  if (reference (self, NULL) != NULL)
    gtk_widget_add_css_class (GTK_WIDGET (self), "differs");
  else
    gtk_widget_remove_css_class (GTK_WIDGET (self), "differs");
}

static void
back_cb (GSimpleAction *action, GVariant *parameter, gpointer data)
{
  HlQuantityRow *self = data;
  const char *name = NULL;
  const HlPlant *there = reference (self, &name);
  HlAddress where = self->address;
  const HlValue *value = there != NULL ? hl_plant_value_wherever (there, &self->address, &where) : NULL;
  g_autoptr (GError) error = NULL;
  if (there == NULL)
    return;
  g_object_ref (self);
  if (!hl_session_set_value (self->session, &where, value, &error) && !self->is_retired)
    hl_quantity_row_set_note (self, error->message, TRUE);
  g_object_unref (self);
}

void
hl_quantity_row_append_way_back (HlQuantityRow *self, GMenu *menu)
{
  const char *name = NULL;
  const HlPlant *there = reference (self, &name);
  g_autofree char *shown = there != NULL ? shown_there (self, there) : NULL, *label = NULL;
  if (shown == NULL)
    return;
  /* Translators: takes the value of a variant over, "As in Base: 0.07000 bar, given" */
  label = g_strdup_printf (_("As in %s: %s"), name, shown);
  g_menu_append (menu, label, "row.as-reference");
}

void
hl_quantity_row_add_variant_action (HlQuantityRow *self)
{
  g_autoptr (GSimpleAction) back = g_simple_action_new ("as-reference", NULL);
  g_signal_connect (back, "activate", G_CALLBACK (back_cb), self);
  g_action_map_add_action (G_ACTION_MAP (self->actions), G_ACTION (back));
}
