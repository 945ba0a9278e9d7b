/* What is remembered between runs, and where the program's data lie.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "app/hl-settings.h"

#define SCHEMA "local.heatloom.Heatloom"

/* The folder of the running program, for use from the build tree. */
static char *
program_folder (void)
{
  g_autofree char *path = g_file_read_link ("/proc/self/exe", NULL);
  return path != NULL ? g_path_get_dirname (path) : g_strdup (".");
}

/* g_settings_new() aborts where the schema is missing, so it is looked up first. */
static GSettingsSchema *
find_schema (void)
{
  GSettingsSchemaSource *source = g_settings_schema_source_get_default ();
  GSettingsSchema *schema = source != NULL ? g_settings_schema_source_lookup (source, SCHEMA, TRUE) : NULL;
  g_autoptr (GSettingsSchemaSource) own = NULL;
  g_autofree char *folder = program_folder ();
  g_autofree char *built = g_build_filename (folder, "..", "..", "data", NULL);

  if (schema != NULL)
    return schema;
  own = g_settings_schema_source_new_from_directory (built, source, TRUE, NULL);
  return own != NULL ? g_settings_schema_source_lookup (own, SCHEMA, FALSE) : NULL;
}

static GSettings *
settings (void)
{
  static gsize once = 0;
  static GSettings *opened = NULL;
  if (g_once_init_enter (&once))
    {
      GSettingsSchema *schema = find_schema ();
      if (schema != NULL)
        {
          opened = g_settings_new_full (schema, NULL, NULL);
          g_settings_schema_unref (schema);
        }
      g_once_init_leave (&once, 1);
    }
  return opened;
}

int
hl_settings_get_int (const char *key, int fallback)
{
  return settings () != NULL ? g_settings_get_int (settings (), key) : fallback;
}

void
hl_settings_set_int (const char *key, int value)
{
  if (settings () != NULL)
    g_settings_set_int (settings (), key, value);
}

gboolean
hl_settings_get_bool (const char *key, gboolean fallback)
{
  return settings () != NULL ? g_settings_get_boolean (settings (), key) : fallback;
}

void
hl_settings_set_bool (const char *key, gboolean value)
{
  if (settings () != NULL)
    g_settings_set_boolean (settings (), key, value);
}

char *
hl_settings_get_string (const char *key, const char *fallback)
{
  return settings () != NULL ? g_settings_get_string (settings (), key) : g_strdup (fallback);
}

void
hl_settings_set_string (const char *key, const char *value)
{
  if (settings () != NULL)
    g_settings_set_string (settings (), key, value);
}

static char *
find_data_folder (void)
{
  const char *told = g_getenv ("HEATLOOM_DATADIR");
  g_autofree char *folder = program_folder ();
  g_autofree char *source = g_build_filename (folder, "..", "..", "..", "data", NULL);
  g_autofree char *examples = g_build_filename (source, "examples", NULL);

  if (told != NULL && *told != '\0')
    return g_strdup (told);
  if (g_file_test (examples, G_FILE_TEST_IS_DIR))    /* run from a build folder inside the sources */
    return g_canonicalize_filename (source, NULL);
  return g_strdup (HL_DATADIR);
}

const char *
hl_data_folder (void)
{
  static gsize once = 0;
  static char *folder = NULL;
  if (g_once_init_enter (&once))
    {
      folder = find_data_folder ();
      g_once_init_leave (&once, 1);
    }
  return folder;
}
