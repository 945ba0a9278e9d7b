/* The context menu of the canvas.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "app/hl-canvas-private.h"
#include "plant/i18n.h"

static GMenuModel *
order_menu (void)
{
  static const struct { const char *label, *action; } lines[] = {
    { N_("Left edges"), "win.align::left" }, { N_("Centres, one above the other"), "win.align::centre" }, { N_("Right edges"), "win.align::right" },
    { N_("Top edges"), "win.align::top" }, { N_("Middles, side by side"), "win.align::middle" }, { N_("Bottom edges"), "win.align::bottom" },
    { N_("Space evenly across"), "win.distribute::across" }, { N_("Space evenly down"), "win.distribute::down" },
  };
  GMenu *menu = g_menu_new ();
  for (guint n = 0; n < G_N_ELEMENTS (lines); n++)
    g_menu_append (menu, _(lines[n].label), lines[n].action);
  return G_MENU_MODEL (menu);
}

static GMenuModel *
context_menu (HlCanvas *self)
{
  GMenu *menu = g_menu_new (), *section = g_menu_new ();
  guint n;
  const char *const *ids = hl_session_selection (self->session, &n);

  if (n == 1 && hl_plant_find_component (hl_canvas_plant (self), ids[0]) != NULL)
    {
      g_menu_append (section, _("Connect …"), "win.connect-menu");
      g_menu_append (section, _("Take off its shaft"), "win.leave-shaft");
    }
  if (n > 1)
    {
      g_autoptr (GMenuModel) order = order_menu ();
      g_menu_append (section, _("Put on one shaft"), "win.join-selection");
      g_menu_append_submenu (section, _("Line up"), order);
    }
  if (n == 1 && hl_plant_find_stream (hl_canvas_plant (self), ids[0]) != NULL)
    {
      g_menu_append (section, _("Let the line find its way"), "win.straighten");
      g_menu_append (section, _("Let the label find its place"), "win.reset-label");
    }
  g_menu_append_section (menu, NULL, G_MENU_MODEL (section));
  g_object_unref (section);
  section = g_menu_new ();
  if (n > 0)
    {
      g_menu_append (section, _("Turn"), "win.turn");
      g_menu_append (section, _("Mirror"), "win.mirror");
      g_menu_append (section, _("Cut"), "win.cut");
      g_menu_append (section, _("Copy"), "win.copy");
      g_menu_append (section, _("Duplicate"), "win.duplicate");
      g_menu_append (section, _("Delete"), "win.delete");
    }
  g_menu_append_section (menu, NULL, G_MENU_MODEL (section));
  g_object_unref (section);
  section = g_menu_new ();
  g_menu_append (section, _("Add a component …"), "win.quick-add");
  g_menu_append (section, _("Paste"), "win.paste");
  g_menu_append (section, _("Select everything"), "win.select-all");
  g_menu_append (section, _("Show the whole plant"), "win.zoom-fit");
  g_menu_append_section (menu, NULL, G_MENU_MODEL (section));
  g_object_unref (section);
  return G_MENU_MODEL (menu);
}

static void
show_context_menu (HlCanvas *self, double vx, double vy)
{
  g_autoptr (GMenuModel) menu = context_menu (self);
  GtkWidget *popover = gtk_popover_menu_new_from_model (menu);
  gtk_popover_set_has_arrow (GTK_POPOVER (popover), FALSE);
  gtk_widget_set_halign (popover, GTK_ALIGN_START);
  hl_canvas_set_popover (self, popover, vx, vy);
}

static void
context_cb (GtkGestureClick *click, int n_press, double vx, double vy, HlCanvas *self)
{
  const char *id = hl_canvas_component_at (self, vx, vy);
  int stream = hl_canvas_label_at (self, vx, vy);
  if (stream < 0 && id == NULL)
    stream = hl_canvas_stream_at (self, vx, vy);
  if (stream >= 0)
    id = hl_plant_stream (hl_canvas_plant (self), (guint) stream)->id;
  if (!hl_session_is_selected (self->session, id))
    hl_session_select (self->session, id, FALSE);
  show_context_menu (self, vx, vy);
}

static gboolean
menu_key_cb (GtkWidget *widget, GVariant *arguments, gpointer data)
{
  HlCanvas *self = HL_CANVAS (widget);
  guint n;
  const char *const *ids = hl_session_selection (self->session, &n);
  double vx = gtk_widget_get_width (widget) / 2.0, vy = gtk_widget_get_height (widget) / 2.0;
  if (n > 0)
    hl_canvas_locate (self, ids[0], NULL, &vx, &vy);
  show_context_menu (self, vx, vy);
  return TRUE;
}

void
hl_canvas_add_menu (HlCanvas *self)
{
  static const struct { guint key; GdkModifierType modifiers; } keys[] = { { GDK_KEY_Menu, 0 }, { GDK_KEY_F10, GDK_SHIFT_MASK } };
  GtkEventController *controller = gtk_shortcut_controller_new ();
  GtkGesture *click = gtk_gesture_click_new ();
  for (guint n = 0; n < G_N_ELEMENTS (keys); n++)
    gtk_shortcut_controller_add_shortcut (GTK_SHORTCUT_CONTROLLER (controller),
                                          gtk_shortcut_new (gtk_keyval_trigger_new (keys[n].key, keys[n].modifiers),
                                                            gtk_callback_action_new (menu_key_cb, NULL, NULL)));
  gtk_widget_add_controller (GTK_WIDGET (self), controller);
  gtk_gesture_single_set_button (GTK_GESTURE_SINGLE (click), GDK_BUTTON_SECONDARY);
  g_signal_connect (click, "pressed", G_CALLBACK (context_cb), self);
  gtk_widget_add_controller (GTK_WIDGET (self), GTK_EVENT_CONTROLLER (click));
}
