/* Menus of the header bar, and the window of shortcuts.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "app/hl-window-private.h"
#include "app/hl-demos.h"
#include "plant/i18n.h"

static void
append (GMenu *menu, const char *label, const char *action)
{
  g_menu_append (menu, label, action);
}

static void
append_choice (GMenu *menu, const char *label, const char *action, const char *target)
{
  GMenuItem *item = g_menu_item_new (label, NULL);
  g_menu_item_set_action_and_target_value (item, action, g_variant_new_string (target));
  g_menu_append_item (menu, item);
  g_object_unref (item);
}

static GMenu *
append_section (GMenu *menu, const char *heading)
{
  GMenu *section = g_menu_new ();
  g_menu_append_section (menu, heading, G_MENU_MODEL (section));
  g_object_unref (section);
  return section;
}

/* Every plant in the examples folder, by its title. */
static void
append_demos (GMenu *menu)
{
  g_autoptr (GPtrArray) demos = hl_demos_list ();
  for (guint n = 0; n < demos->len; n++)
    {
      const HlDemo *demo = g_ptr_array_index (demos, n);
      append_choice (menu, demo->title, "win.open-demo", demo->file);
    }
}

/* Files opened lately, with their folder where two have one name. */
static void
append_recent (GMenu *menu)
{
  g_auto (GStrv) paths = hl_window_recent_paths (6);
  for (char **path = paths; *path != NULL; path++)
    {
      g_autofree char *name = g_path_get_basename (*path), *folder = g_path_get_dirname (*path);
      g_autofree char *label = NULL;
      gboolean is_shared = FALSE;
      for (char **other = paths; *other != NULL; other++)
        {
          g_autofree char *other_name = g_path_get_basename (*other);
          is_shared |= other != path && g_str_equal (name, other_name);
        }
      label = is_shared ? g_strdup_printf ("%s (%s)", name, folder) : g_strdup (name);
      append_choice (menu, label, "win.open-path", *path);
    }
}

static GMenuModel *
open_menu (void)
{
  GMenu *menu = g_menu_new (), *section = append_section (menu, NULL);
  append (section, _("Open a plant …"), "win.open");
  append (section, _("New plant"), "win.new");
  append (section, _("New window"), "app.new-window");
  section = g_menu_new ();
  append_recent (section);
  if (g_menu_model_get_n_items (G_MENU_MODEL (section)) > 0)
    g_menu_append_section (menu, _("Opened lately"), G_MENU_MODEL (section));
  g_object_unref (section);
  append_demos (append_section (menu, _("Demo plants")));
  section = append_section (menu, NULL);
  append (section, _("Save"), "win.save");
  append (section, _("Save as …"), "win.save-as");
  append (section, _("Revert to the file"), "win.revert");
  return G_MENU_MODEL (menu);
}

static GMenuModel *
main_menu (void)
{
  GMenu *menu = g_menu_new (), *section = append_section (menu, _("Units"));
  append_choice (section, _("Metric (bar, °C, kg/s)"), "win.units", "metric");
  append_choice (section, _("SI (kPa, K)"), "win.units", "si");
  append_choice (section, _("US customary (psi, °F, lb/h)"), "win.units", "us");
  section = append_section (menu, _("Look"));
  append_choice (section, _("As the system"), "win.look", "system");
  append_choice (section, _("Light"), "win.look", "light");
  append_choice (section, _("Dark"), "win.look", "dark");
  section = append_section (menu, _("View"));
  append (section, _("Diagram beside the canvas"), "win.diagram-beside");
  append (section, _("Show the whole plant"), "win.zoom-fit");
  section = append_section (menu, NULL);
  append (section, _("Keyboard shortcuts"), "win.shortcuts");
  append (section, _("About Heatloom"), "win.about");
  return G_MENU_MODEL (menu);
}

/* Shortcuts */

typedef struct { const char *title, *keys; } Shortcut;    /* keys: accelerators parted by spaces */
static const Shortcut canvas_keys[] = {
  { N_("Add a component by its name"), "slash Insert" },
  { N_("Connect the selected component"), "c" },
  { N_("Turn a quarter"), "r" },
  { N_("Mirror"), "m" },
  { N_("Delete"), "Delete" },
  { N_("Move by one grid step"), "Left Right Up Down" },
  { N_("Move by five grid steps"), "<Shift>Left" },
  { N_("Select everything"), "<Control>a" },
  { N_("Duplicate"), "<Control>d" },
  { N_("Cut, copy, paste"), "<Control>x <Control>c <Control>v" },
  { N_("Let go"), "Escape" },
  { N_("Next component"), "Tab" },
  { N_("Menu of the selection"), "<Shift>F10" },
};
static const Shortcut view_keys[] = {
  { N_("Larger, smaller"), "plus minus" },
  { N_("Natural size"), "1" },
  { N_("Show the whole plant"), "0" },
  { N_("Diagram beside the canvas"), "F8" },
  { N_("Light and dark in turn"), "F6" },
};
static const Shortcut general_keys[] = {
  { N_("Open"), "<Control>o" },
  { N_("New plant"), "<Control>n" },
  { N_("New window"), "<Control><Shift>n" },
  { N_("Save"), "<Control>s" },
  { N_("Save as"), "<Control><Shift>s" },
  { N_("Hand over"), "<Control>e" },
  { N_("Variants"), "F4" },
  { N_("Next, previous variant"), "<Control>Page_Down <Control>Page_Up" },
  { N_("Undo"), "<Control>z" },
  { N_("Redo"), "<Control><Shift>z" },
  { N_("These shortcuts"), "F1" },
  { N_("Close the window"), "<Control>w" },
  { N_("Quit"), "<Control>q" },
};
static const char *const mouse_words[][2] = {
  { N_("Pan"), N_("middle button, or space and drag") },
  { N_("Zoom"), N_("Ctrl and wheel") },
  { N_("Add to the selection"), N_("Shift and click") },
  { N_("Add a component by its name"), N_("double click on the sheet or a line") },
};

static GtkWidget *
label_new (const char *text, const char *css_class)
{
  GtkWidget *label = gtk_label_new (text);
  gtk_label_set_xalign (GTK_LABEL (label), 0.0f);
  gtk_widget_add_css_class (label, css_class);
  return label;
}

/* "<Control>s" as "Ctrl+S" in a key's outline; several side by side. */
static GtkWidget *
keys_new (const char *keys)
{
  g_auto (GStrv) each = g_strsplit (keys, " ", -1);
  GtkWidget *box = gtk_box_new (GTK_ORIENTATION_HORIZONTAL, 4);
  gtk_widget_set_halign (box, GTK_ALIGN_START);
  for (char **key = each; *key != NULL; key++)
    {
      guint value;
      GdkModifierType modifiers;
      g_autofree char *text = NULL;
      if (!gtk_accelerator_parse (*key, &value, &modifiers))
        continue;
      text = gtk_accelerator_get_label (value, modifiers);
      gtk_box_append (GTK_BOX (box), label_new (text, "keycap"));
    }
  return box;
}

static int
attach_group (GtkGrid *grid, int row, const char *title, const Shortcut *keys, guint n)
{
  gtk_grid_attach (grid, label_new (title, "shortcut-heading"), 0, row++, 2, 1);
  for (guint i = 0; i < n; i++, row++)
    {
      gtk_grid_attach (grid, keys_new (keys[i].keys), 0, row, 1, 1);
      gtk_grid_attach (grid, label_new (_(keys[i].title), "shortcut-title"), 1, row, 1, 1);
    }
  return row;
}

static GtkGrid *
grid_new (void)
{
  GtkGrid *grid = GTK_GRID (gtk_grid_new ());
  gtk_grid_set_column_spacing (grid, 14);
  gtk_grid_set_row_spacing (grid, 5);
  gtk_widget_set_valign (GTK_WIDGET (grid), GTK_ALIGN_START);
  return grid;
}

static void
shortcuts_cb (GSimpleAction *action, GVariant *parameter, gpointer data)
{
  GtkWidget *window = gtk_window_new (), *box = gtk_box_new (GTK_ORIENTATION_HORIZONTAL, 36);
  GtkEventController *controller = gtk_shortcut_controller_new ();
  GtkGrid *left = grid_new (), *right = grid_new ();
  int row;

  row = attach_group (left, 0, _("On the canvas"), canvas_keys, G_N_ELEMENTS (canvas_keys));
  gtk_grid_attach (left, label_new (_("By mouse"), "shortcut-heading"), 0, row++, 2, 1);
  for (guint n = 0; n < G_N_ELEMENTS (mouse_words); n++, row++)
    {
      gtk_grid_attach (left, label_new (_(mouse_words[n][1]), "shortcut-mouse"), 0, row, 1, 1);
      gtk_grid_attach (left, label_new (_(mouse_words[n][0]), "shortcut-title"), 1, row, 1, 1);
    }
  row = attach_group (right, 0, _("General"), general_keys, G_N_ELEMENTS (general_keys));
  attach_group (right, row, _("View"), view_keys, G_N_ELEMENTS (view_keys));
  gtk_box_append (GTK_BOX (box), GTK_WIDGET (left));
  gtk_box_append (GTK_BOX (box), GTK_WIDGET (right));
  gtk_widget_add_css_class (box, "shortcuts");

  gtk_window_set_title (GTK_WINDOW (window), _("Keyboard shortcuts"));
  gtk_window_set_titlebar (GTK_WINDOW (window), gtk_header_bar_new ());
  gtk_window_set_child (GTK_WINDOW (window), box);
  gtk_window_set_transient_for (GTK_WINDOW (window), GTK_WINDOW (data));
  gtk_window_set_destroy_with_parent (GTK_WINDOW (window), TRUE);
  gtk_window_set_modal (GTK_WINDOW (window), TRUE);
  gtk_window_set_resizable (GTK_WINDOW (window), FALSE);
  gtk_widget_add_css_class (window, "heatloom");
  gtk_shortcut_controller_add_shortcut (GTK_SHORTCUT_CONTROLLER (controller),
                                        gtk_shortcut_new (gtk_keyval_trigger_new (GDK_KEY_Escape, 0), gtk_named_action_new ("window.close")));
  gtk_widget_add_controller (window, controller);
  gtk_window_present (GTK_WINDOW (window));
}

/* Menus are made when they are opened: the demo plants are read for their titles then. */
static void
make_popup_cb (GtkMenuButton *button, gpointer make_model)
{
  g_autoptr (GMenuModel) model = ((GMenuModel *(*) (void)) make_model) ();
  gtk_menu_button_set_popover (button, gtk_popover_menu_new_from_model (model));
}

void
hl_window_fill_menus (HlWindow *self)
{
  static const GActionEntry entries[] = { { "shortcuts", shortcuts_cb } };
  gtk_menu_button_set_create_popup_func (self->open_button, make_popup_cb, open_menu, NULL);
  gtk_menu_button_set_create_popup_func (self->menu_button, make_popup_cb, main_menu, NULL);
  g_action_map_add_action_entries (G_ACTION_MAP (self), entries, G_N_ELEMENTS (entries), self);
}
