/* Where a value comes from: the pill that says it in a word and a colour, and its menu.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "app/hl-quantity-row-private.h"
#include "plant/i18n.h"

#include <math.h>

static HlOrigin
origin_now (HlQuantityRow *self)
{
  const HlValue *value = hl_quantity_row_value (self);
  return value != NULL ? value->origin : HL_ORIGIN_FOUND;
}

/* The default of the kind, or where it has none the present number. */
static gboolean
number_to_assume (HlQuantityRow *self, double *si)
{
  const HlPlant *plant = hl_session_plant (self->session);
  const HlComponent *owner = self->address.owner == HL_OWNER_COMPONENT ? hl_plant_find_component (plant, self->address.id) : NULL;
  *si = hl_component_default (owner, self->kind, self->number);
  if (isfinite (*si))
    return TRUE;
  return hl_quantity_row_number (self, si);
}

static void
set_origin (HlQuantityRow *self, HlOrigin origin)
{
  HlAddress carrier = hl_quantity_row_carrier (self);
  HlValue value = { .origin = origin };
  g_autoptr (GError) error = NULL;
  gboolean done = TRUE;

  if (origin == origin_now (self))
    return;
  g_object_ref (self);
  if (origin == HL_ORIGIN_FOUND)
    done = hl_session_set_value (self->session, &carrier, NULL, &error);
  else if (origin == HL_ORIGIN_ASSUMED && number_to_assume (self, &value.value))
    done = hl_session_set_value (self->session, &carrier, &value, &error);
  else if (origin == HL_ORIGIN_GIVEN && hl_quantity_row_number (self, &value.value))
    done = hl_session_set_value (self->session, &carrier, &value, &error);
  else
    {
      hl_quantity_row_start_typing (self, origin == HL_ORIGIN_TIED ? "=" : "");
      if (origin == HL_ORIGIN_TIED)
        hl_quantity_row_set_note (self, _("Type what it follows, for instance  =0.23*B1.steam.p  or  =T1.exhaust.T - 5 K"), FALSE);
    }
  if (!done && !self->is_retired)
    hl_quantity_row_set_note (self, error->message, TRUE);
  g_object_unref (self);
}

static void
origin_cb (GSimpleAction *action, GVariant *parameter, gpointer data)
{
  const char *id = g_variant_get_string (parameter, NULL);

  for (HlOrigin origin = HL_ORIGIN_FOUND; origin <= HL_ORIGIN_TIED; origin++)
    if (strcmp (id, hl_origin_id (origin)) == 0)
      set_origin (data, origin);
}

static void
explain_cb (GSimpleAction *action, GVariant *parameter, gpointer data)
{
  HlQuantityRow *self = data;
  hl_quantity_row_show_explanation (self, !gtk_widget_get_visible (self->explanation));
}

static void
add_item (GMenu *menu, const char *text, HlOrigin origin)
{
  GMenuItem *item = g_menu_item_new (text, NULL);
  g_menu_item_set_action_and_target (item, "row.origin", "s", hl_origin_id (origin));
  g_menu_append_item (menu, item);
  g_object_unref (item);
}

static void
menu_closed_cb (HlQuantityRow *self)
{
  if (!self->is_retired && !self->is_focused)
    gtk_widget_grab_focus (self->entry);
}

/* The menu says what each choice would make of the value. */
static void
create_menu_cb (GtkMenuButton *button, gpointer data)
{
  HlQuantityRow *self = data;
  HlUnitSet units = hl_pane_units (self->session);
  g_autoptr (GMenu) menu = g_menu_new (), origins = g_menu_new (), more = g_menu_new ();
  g_autofree char *given = NULL, *assumed = NULL, *now = NULL;
  double si;

  if (self->kind->flags & HL_QUANTITY_DERIVED)
    {
      g_menu_append (menu, _("Explain this value"), "row.explain");
      gtk_menu_button_set_popover (button, gtk_popover_menu_new_from_model (G_MENU_MODEL (menu)));
      return;
    }
  if (hl_quantity_row_number (self, &si))
    {
      now = hl_quantity_format (self->kind, si, units);
      given = g_strdup_printf (_("Given: %s"), now);
    }
  add_item (origins, given != NULL ? given : _("Given: type a value"), HL_ORIGIN_GIVEN);
  if (number_to_assume (self, &si))
    {
      g_autofree char *text = hl_quantity_format (self->kind, si, units);
      assumed = g_strdup_printf (_("Assumed: %s"), text);
      add_item (origins, assumed, HL_ORIGIN_ASSUMED);
    }
  add_item (origins, _("Tied to another quantity…"), HL_ORIGIN_TIED);
  add_item (origins, _("Found by solving"), HL_ORIGIN_FOUND);
  g_menu_append_section (menu, NULL, G_MENU_MODEL (origins));
  hl_quantity_row_append_way_back (self, more);
  g_menu_append (more, _("Explain this value"), "row.explain");
  g_menu_append_section (menu, NULL, G_MENU_MODEL (more));

  GtkWidget *popover = gtk_popover_menu_new_from_model (G_MENU_MODEL (menu));
  g_signal_connect_object (popover, "closed", G_CALLBACK (menu_closed_cb), self, G_CONNECT_SWAPPED);
  gtk_menu_button_set_popover (button, popover);
}

static int
text_width (GtkWidget *widget, const char *text)
{
  g_autoptr (PangoLayout) layout = gtk_widget_create_pango_layout (widget, text);
  int width;

  pango_layout_get_pixel_size (layout, &width, NULL);
  return width;
}

/* All pills are as wide as the longest word, in whatever language and font: measured where the style sheet applies. */
static void
pill_mapped_cb (GtkWidget *pill)
{
  int widest = 0, whole;

  gtk_widget_set_size_request (pill, -1, -1);
  gtk_widget_measure (pill, GTK_ORIENTATION_HORIZONTAL, -1, NULL, &whole, NULL, NULL);
  for (HlOrigin origin = HL_ORIGIN_FOUND; origin <= HL_ORIGIN_TIED; origin++)
    widest = MAX (widest, text_width (pill, hl_origin_name (origin)));
  gtk_widget_set_size_request (pill, widest + whole - text_width (pill, gtk_label_get_text (GTK_LABEL (pill))), -1);
}

void
hl_quantity_row_add_origin (HlQuantityRow *self)
{
  self->actions = g_simple_action_group_new ();
  self->origin_action = g_simple_action_new_stateful ("origin", G_VARIANT_TYPE_STRING, g_variant_new_string ("found"));
  g_signal_connect (self->origin_action, "activate", G_CALLBACK (origin_cb), self);
  g_action_map_add_action (G_ACTION_MAP (self->actions), G_ACTION (self->origin_action));
  g_autoptr (GSimpleAction) explain = g_simple_action_new ("explain", NULL);
  g_signal_connect (explain, "activate", G_CALLBACK (explain_cb), self);
  g_action_map_add_action (G_ACTION_MAP (self->actions), G_ACTION (explain));
  hl_quantity_row_add_variant_action (self);
  gtk_widget_insert_action_group (GTK_WIDGET (self), "row", G_ACTION_GROUP (self->actions));

  self->pill = gtk_label_new ("");
  gtk_widget_add_css_class (self->pill, "pill");
  g_signal_connect (self->pill, "map", G_CALLBACK (pill_mapped_cb), NULL);
  self->origin_button = gtk_menu_button_new ();
  gtk_menu_button_set_child (GTK_MENU_BUTTON (self->origin_button), self->pill);
  gtk_menu_button_set_has_frame (GTK_MENU_BUTTON (self->origin_button), FALSE);
  gtk_widget_add_css_class (self->origin_button, "origin");
  gtk_widget_set_valign (self->origin_button, GTK_ALIGN_CENTER);
  gtk_menu_button_set_create_popup_func (GTK_MENU_BUTTON (self->origin_button), create_menu_cb, self, NULL);
  gtk_box_append (GTK_BOX (self->line), self->origin_button);
}

/* "assumed" in the class list of row and pill colours value and word alike. */
static void
set_origin_class (GtkWidget *widget, HlOrigin origin)
{
  for (HlOrigin other = HL_ORIGIN_FOUND; other <= HL_ORIGIN_TIED; other++)
    if (other != origin)
      gtk_widget_remove_css_class (widget, hl_origin_id (other));
  gtk_widget_add_css_class (widget, hl_origin_id (origin));
}

/* Telling the accessibility tree costs more than the rest of an update: only where the words are other ones. */
static void
describe (HlQuantityRow *self, const char *value, const char *origin)
{
  g_autofree char *difference = hl_quantity_row_difference (self), *label = NULL;
  g_autofree char *description = difference != NULL ? g_strdup_printf ("%s, %s; %s", value, origin, difference) : g_strdup_printf ("%s, %s", value, origin);

  if (g_strcmp0 (description, self->described) == 0)
    return;
  label = g_strdup_printf (_("Origin of %s: %s"), self->name, origin);
  hl_pane_set_accessible (self->origin_button, label, NULL);
  hl_pane_set_accessible (self->entry, self->name, description);
  hl_pane_set_accessible (GTK_WIDGET (self), self->name, description);
  g_free (self->described);
  self->described = g_steal_pointer (&description);
}

void
hl_quantity_row_update_origin (HlQuantityRow *self)
{
  HlOrigin origin = origin_now (self);
  double si;
  gboolean is_known = hl_quantity_row_number (self, &si), is_found = origin != HL_ORIGIN_FOUND || is_known;
  /* What is neither given nor solved is not "found": there is none (quality of superheated steam), or it is still open. */
  const char *other = hl_solution_is_solved (hl_session_solution (self->session)) ? C_("value", "none") : C_("value", "open");
  const char *word = is_found ? hl_origin_name (origin) : other;
  g_autofree char *shown = is_known ? hl_quantity_format (self->kind, si, hl_pane_units (self->session)) : g_strdup (_("not known"));

  set_origin_class (GTK_WIDGET (self), origin);
  gtk_label_set_text (GTK_LABEL (self->pill), word);
  if (!is_found)
    gtk_widget_add_css_class (GTK_WIDGET (self), "open");
  else
    gtk_widget_remove_css_class (GTK_WIDGET (self), "open");
  g_simple_action_set_state (self->origin_action, g_variant_new_string (hl_origin_id (origin)));
  describe (self, shown, word);
}
