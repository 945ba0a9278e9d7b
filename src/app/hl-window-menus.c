/* Menus of the header bar, and the window of shortcuts.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "app/hl-window-private.h"
#include "app/hl-settings.h"
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

static int
compare_names (gconstpointer a, gconstpointer b)
{
  return g_strcmp0 (*(char *const *) a, *(char *const *) b);
}

/* Every plant in the examples folder, by its title. */
static void
append_demos (GMenu *menu)
{
  g_autofree char *folder = g_build_filename (hl_data_folder (), "examples", NULL);
  g_autoptr (GPtrArray) names = g_ptr_array_new_with_free_func (g_free);
  GDir *dir = g_dir_open (folder, 0, NULL);
  const char *name;
  if (dir == NULL)
    return;
  while ((name = g_dir_read_name (dir)) != NULL)
    if (g_str_has_suffix (name, ".heatloom"))
      g_ptr_array_add (names, g_strdup (name));
  g_dir_close (dir);
  g_ptr_array_sort (names, compare_names);
  for (guint n = 0; n < names->len; n++)
    {
      const char *file = g_ptr_array_index (names, n);
      g_autofree char *path = g_build_filename (folder, file, NULL);
      g_autoptr (HlPlant) plant = hl_plant_load (path, NULL);
      if (plant != NULL)
        append_choice (menu, *hl_plant_title (plant) != '\0' ? hl_plant_title (plant) : file, "win.open-demo", file);
    }
}

static GMenuModel *
open_menu (void)
{
  GMenu *menu = g_menu_new (), *section = append_section (menu, NULL);
  append (section, _("Open a plant …"), "win.open");
  append (section, _("New plant"), "win.new");
  append_demos (append_section (menu, _("Demo plants")));
  section = append_section (menu, NULL);
  append (section, _("Save"), "win.save");
  append (section, _("Save as …"), "win.save-as");
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

/* Shortcuts, written as one definition that GtkBuilder reads. */

typedef struct { const char *title, *keys; } Shortcut;
static const Shortcut canvas_keys[] = {
  { N_("Connect the selected component"), "c" },
  { N_("Turn a quarter"), "r" },
  { N_("Mirror"), "m" },
  { N_("Delete"), "Delete" },
  { N_("Move by one grid step"), "Left Right Up Down" },
  { N_("Move by five grid steps"), "&lt;Shift&gt;Left" },
  { N_("Select everything"), "&lt;Control&gt;a" },
  { N_("Duplicate"), "&lt;Control&gt;d" },
  { N_("Let go"), "Escape" },
  { N_("Next component"), "Tab" },
  { N_("Menu of the selection"), "Menu &lt;Shift&gt;F10" },
  { NULL }
};
static const Shortcut view_keys[] = {
  { N_("Larger, smaller"), "plus minus" },
  { N_("Natural size"), "1" },
  { N_("Show the whole plant"), "0 &lt;Control&gt;0" },
  { N_("Diagram beside the canvas"), "F8" },
  { N_("Light and dark in turn"), "F6" },
  { NULL }
};
static const Shortcut general_keys[] = {
  { N_("Open"), "&lt;Control&gt;o" },
  { N_("New plant"), "&lt;Control&gt;n" },
  { N_("Save"), "&lt;Control&gt;s" },
  { N_("Save as"), "&lt;Control&gt;&lt;Shift&gt;s" },
  { N_("Hand over"), "&lt;Control&gt;e" },
  { N_("Undo"), "&lt;Control&gt;z" },
  { N_("Redo"), "&lt;Control&gt;&lt;Shift&gt;z" },
  { N_("These shortcuts"), "F1" },
  { N_("Close the window"), "&lt;Control&gt;w" },
  { N_("Quit"), "&lt;Control&gt;q" },
  { NULL }
};

static void
write_group (GString *xml, const char *title, const Shortcut *keys)
{
  g_autofree char *group = g_markup_printf_escaped ("<child><object class='GtkShortcutsGroup'><property name='title'>%s</property>", title);
  g_string_append (xml, group);
  for (; keys->title != NULL; keys++)
    {
      g_autofree char *head = g_markup_printf_escaped ("<child><object class='GtkShortcutsShortcut'><property name='title'>%s</property>", _(keys->title));
      g_string_append_printf (xml, "%s<property name='accelerator'>%s</property></object></child>", head, keys->keys);
    }
  g_string_append (xml, "</object></child>");
}

static void
shortcuts_cb (GSimpleAction *action, GVariant *parameter, gpointer data)
{
  g_autoptr (GString) xml = g_string_new ("<interface><object class='GtkShortcutsWindow' id='shortcuts'><property name='modal'>1</property><child>"
                                          "<object class='GtkShortcutsSection'><property name='section-name'>all</property><property name='max-height'>12</property>");
  g_autoptr (GtkBuilder) builder = gtk_builder_new ();
  g_autoptr (GError) error = NULL;
  GtkWindow *window;

  write_group (xml, _("On the canvas"), canvas_keys);
  write_group (xml, _("View"), view_keys);
  write_group (xml, _("General"), general_keys);
  g_string_append (xml, "</object></child></object></interface>");
  if (!gtk_builder_add_from_string (builder, xml->str, -1, &error))
    {
      g_warning ("shortcuts: %s", error->message);
      return;
    }
  window = GTK_WINDOW (gtk_builder_get_object (builder, "shortcuts"));
  gtk_window_set_transient_for (window, GTK_WINDOW (data));
  gtk_window_present (window);
}

void
hl_window_fill_menus (HlWindow *self)
{
  static const GActionEntry entries[] = { { "shortcuts", shortcuts_cb } };
  g_autoptr (GMenuModel) opening = open_menu (), general = main_menu ();
  gtk_menu_button_set_menu_model (self->open_button, opening);
  gtk_menu_button_set_menu_model (self->menu_button, general);
  g_action_map_add_action_entries (G_ACTION_MAP (self), entries, G_N_ELEMENTS (entries), self);
}
