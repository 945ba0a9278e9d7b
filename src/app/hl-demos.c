/* The demo plants that come with the program.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "app/hl-demos.h"
#include "app/hl-settings.h"
#include "plant/plant.h"

static void
demo_free (gpointer data)
{
  HlDemo *demo = data;
  g_free (demo->file);
  g_free (demo->title);
  g_free (demo);
}

static int
compare_files (gconstpointer a, gconstpointer b)
{
  return g_strcmp0 ((*(HlDemo *const *) a)->file, (*(HlDemo *const *) b)->file);
}

static void
add_demo (GPtrArray *demos, const char *folder, const char *file)
{
  g_autofree char *path = g_build_filename (folder, file, NULL);
  g_autoptr (HlPlant) plant = hl_plant_load (path, NULL);
  HlDemo *demo;
  if (plant == NULL)
    return;
  demo = g_new (HlDemo, 1);
  demo->file = g_strdup (file);
  demo->title = g_strdup (*hl_plant_title (plant) != '\0' ? hl_plant_title (plant) : file);
  g_ptr_array_add (demos, demo);
}

GPtrArray *
hl_demos_list (void)
{
  g_autofree char *folder = g_build_filename (hl_data_folder (), "examples", NULL);
  GPtrArray *demos = g_ptr_array_new_with_free_func (demo_free);
  GDir *dir = g_dir_open (folder, 0, NULL);
  const char *file;
  if (dir == NULL)
    return demos;
  while ((file = g_dir_read_name (dir)) != NULL)
    if (g_str_has_suffix (file, ".heatloom"))
      add_demo (demos, folder, file);
  g_dir_close (dir);
  g_ptr_array_sort (demos, compare_files);
  return demos;
}
