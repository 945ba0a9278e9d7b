/* Actions of the window that change what is seen, not the plant: zoom, look, tabs, dialogs.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "app/hl-window-private.h"
#include "app/hl-about.h"
#include "app/hl-appearance.h"
#include "app/hl-export-dialog.h"
#include "app/hl-settings.h"

static void
zoom_in_cb (GSimpleAction *action, GVariant *parameter, gpointer data)
{
  hl_canvas_zoom_by (HL_WINDOW (data)->canvas, 1.25);
}

static void
zoom_out_cb (GSimpleAction *action, GVariant *parameter, gpointer data)
{
  hl_canvas_zoom_by (HL_WINDOW (data)->canvas, 0.8);
}

static void
zoom_normal_cb (GSimpleAction *action, GVariant *parameter, gpointer data)
{
  HlCanvas *canvas = HL_WINDOW (data)->canvas;
  hl_canvas_zoom_by (canvas, 1.0 / hl_canvas_get_zoom (canvas));
}

static void
zoom_fit_cb (GSimpleAction *action, GVariant *parameter, gpointer data)
{
  hl_canvas_fit (HL_WINDOW (data)->canvas);
}

static void
beside_cb (GSimpleAction *action, GVariant *value, gpointer data)
{
  g_simple_action_set_state (action, value);
  hl_window_place_diagram (HL_WINDOW (data), g_variant_get_boolean (value));
}

static void
look_cb (GSimpleAction *action, GVariant *value, gpointer data)
{
  g_simple_action_set_state (action, value);
  hl_appearance_set (hl_appearance_from_id (g_variant_get_string (value, NULL)));
  hl_settings_set_string ("look", g_variant_get_string (value, NULL));
}

/* Light and dark in turn, whatever the desktop says. */
static void
look_next_cb (GSimpleAction *action, GVariant *parameter, gpointer data)
{
  gboolean is_light = hl_appearance_theme () == hl_theme (HL_THEME_LIGHT);
  g_action_group_change_action_state (G_ACTION_GROUP (data), "look", g_variant_new_string (is_light ? "dark" : "light"));
}

static void
tab_cb (GSimpleAction *action, GVariant *parameter, gpointer data)
{
  gtk_stack_set_visible_child_name (HL_WINDOW (data)->stack, g_variant_get_string (parameter, NULL));
}

/* Windows */

static void
export_cb (GSimpleAction *action, GVariant *parameter, gpointer data)
{
  hl_export_dialog_present (GTK_WINDOW (data), HL_WINDOW (data)->session);
}

static void
about_cb (GSimpleAction *action, GVariant *parameter, gpointer data)
{
  hl_about_present (GTK_WINDOW (data));
}

static void
close_cb (GSimpleAction *action, GVariant *parameter, gpointer data)
{
  gtk_window_close (GTK_WINDOW (data));
}

static void
set_state (HlWindow *self, const char *name, GVariant *state)
{
  g_simple_action_set_state (G_SIMPLE_ACTION (g_action_map_lookup_action (G_ACTION_MAP (self), name)), state);
}

void
hl_window_add_view_actions (HlWindow *self)
{
  static const GActionEntry entries[] = {
    { "zoom-in", zoom_in_cb },
    { "zoom-out", zoom_out_cb },
    { "zoom-normal", zoom_normal_cb },
    { "zoom-fit", zoom_fit_cb },
    { "diagram-beside", NULL, NULL, "false", beside_cb },
    { "look", NULL, "s", "'system'", look_cb },
    { "look-next", look_next_cb },
    { "tab", tab_cb, "s" },
    { "export", export_cb },
    { "about", about_cb },
    { "close-asking", close_cb },
  };
  g_action_map_add_action_entries (G_ACTION_MAP (self), entries, G_N_ELEMENTS (entries), self);
  set_state (self, "look", g_variant_new_string (hl_appearance_id (hl_appearance_get ())));
  set_state (self, "diagram-beside", g_variant_new_boolean (hl_settings_get_bool ("diagram-beside", FALSE)));
}
