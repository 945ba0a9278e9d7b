/* Writing: the text, its way back, files and what can go wrong with them.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "plant-test.h"
#include <glib/gstdio.h>
#include <sys/stat.h>
#include <unistd.h>

/* The text of plant-test.h is written as the program writes, except for keys at their usual value. */
static void
test_write_read_write_is_identical (void)
{
  g_autoptr (HlPlant) plant = loop_plant (), again = NULL;
  GError *error = NULL;
  g_autofree char *text = hl_plant_to_json (plant), *second = NULL;
  again = hl_plant_from_json (text, -1, "again", &error);
  g_assert_no_error (error);
  second = hl_plant_to_json (again);
  g_assert_cmpstr (text, ==, second);
  g_assert_true (hl_plant_equal (plant, again));
  g_assert_cmpstr (text, ==, LOOP_TEXT);
}

/* Every kind with every option, all its defaults, every pose. */
static void
test_all_kinds_come_back (void)
{
  HlPlant *plant = hl_plant_new ();
  g_autoptr (HlPlant) again = NULL;
  GError *error = NULL;
  g_autofree char *text = NULL;
  for (guint k = 0; k < hl_kind_count (); k++)
    for (int pose = 0; pose < 8; pose++)
      {
        g_autofree char *id = g_strdup_printf ("%s%d", hl_kind_nth (k)->letter, pose + 1);
        HlComponent *component = hl_component_new (hl_kind_nth (k), id, pose, -(int) k);
        HlPlant *next;
        component->turn = pose % 4;
        component->is_mirrored = pose >= 4;
        hl_component_set_name (component, "é \"quoted\" \\ \n\t\x01");
        for (guint i = 0; i < component->kind->n_options; i++)
          hl_component_set_option (component, component->kind->options[i].key, pose);
        next = hl_plant_with_component (plant, component);
        hl_plant_unref (plant);
        plant = next;
      }
  text = hl_plant_to_json (plant);
  again = hl_plant_from_json (text, -1, "again", &error);
  g_assert_no_error (error);
  g_assert_true (hl_plant_equal (plant, again));
  hl_plant_unref (plant);
}

static void
test_numbers_keep_every_bit (void)
{
  GRand *rand = g_rand_new_with_seed (3);
  for (int i = 0; i < 500; i++)
    {
      g_autoptr (HlPlant) loop = loop_plant (), again = NULL;
      double p = exp (g_rand_double_range (rand, log (1.0), log (9e8)));
      g_autoptr (HlPlant) plant = with_given (loop, "C1.steam.p", p);
      g_autofree char *text = hl_plant_to_json (plant);
      again = hl_plant_from_json (text, -1, "again", NULL);
      g_assert_nonnull (again);
      g_assert_true (hl_plant_equal (plant, again));
    }
  g_rand_free (rand);
}

static void
test_equality_sees_changes (void)
{
  static const struct { const char *from, *to; } changes[] = {
    { "Loop", "Lopp" }, { "metric", "us" }, { "\"altitude\": 60", "\"altitude\": 61" }, { "west", "east" },
    { "[8, 12]", "[8, 13]" }, { "\"boiler\", \"at\"", "\"boilers\", \"at\"" }, { "\"turn\": 1", "\"turn\": 2" }, { "\"mirror\": true", "\"mirror\": false" },
    { "straight line", "by group" }, { "758.15", "758.25" }, { "0.05*", "0.06*" }, { "[1, 2.5]", "[1, 2.6]" },
    { "[10, 8]", "[10, 9]" }, { "\"label\": [12, 6]", "\"label\": [12, 7]" }, { ", \"label\": [12, 6]", "" }, { "green", "red" },
    { "\"T1\", \"G1\"]", "\"G1\", \"T1\"]" }, { "\"colour\": 3", "\"colour\": 4" }, { "12000000", "13000000" }, { "1.5e+300", "1.6e+300" },
    { "\"tolerance\": {\"T1.inlet.p\": 0.01}", "\"tolerance\": {}" }, { "\"id\": \"P2\", \"kind\": \"pump\"", "\"id\": \"P2\", \"kind\": \"valve\"" },
    { "\"id\": \"3\"", "\"id\": \"33\"" },
  };
  g_autoptr (HlPlant) plant = loop_plant (), same = loop_plant ();
  g_assert_true (hl_plant_equal (plant, same));
  for (gsize i = 0; i < G_N_ELEMENTS (changes); i++)
    {
      g_autoptr (GString) text = g_string_new (LOOP_TEXT);
      g_autoptr (HlPlant) other = NULL;
      GError *error = NULL;
      g_assert_cmpuint (g_string_replace (text, changes[i].from, changes[i].to, 1), ==, 1);
      other = hl_plant_from_json (text->str, -1, "other", &error);
      g_assert_no_error (error);
      if (hl_plant_equal (plant, other))
        g_error ("“%s” for “%s” was not seen", changes[i].to, changes[i].from);
    }
}

static void
test_saving_and_loading (void)
{
  g_autoptr (HlPlant) plant = loop_plant (), loaded = NULL;
  GError *error = NULL;
  g_autofree char *folder = g_dir_make_tmp ("heatloom-XXXXXX", &error);
  g_autofree char *path = g_build_filename (folder, "loop.heatloom", NULL), *link = g_build_filename (folder, "link.heatloom", NULL);
  struct stat state;
  const char *name;
  GDir *dir;
  guint n = 0;
  g_assert_no_error (error);
  g_assert_true (hl_plant_save (plant, path, &error));
  loaded = hl_plant_load (path, &error);
  g_assert_no_error (error);
  g_assert_true (hl_plant_equal (plant, loaded));
  /* Permissions are kept, also behind a link, and nothing temporary is left. */
  g_assert_cmpint (chmod (path, 0600), ==, 0);
  g_assert_cmpint (symlink (path, link), ==, 0);
  g_assert_true (hl_plant_save (plant, link, &error));
  g_assert_cmpint (lstat (link, &state), ==, 0);
  g_assert_true (S_ISLNK (state.st_mode));
  g_assert_cmpint (stat (path, &state), ==, 0);
  g_assert_cmpint (state.st_mode & 0777, ==, 0600);
  dir = g_dir_open (folder, 0, NULL);
  while ((name = g_dir_read_name (dir)) != NULL)
    n++;
  g_dir_close (dir);
  g_assert_cmpuint (n, ==, 2);
  g_unlink (link);
  g_unlink (path);
  g_rmdir (folder);
}

static void
test_file_errors_name_the_file (void)
{
  g_autoptr (HlPlant) plant = loop_plant ();
  GError *error = NULL;
  g_autofree char *folder = g_dir_make_tmp ("heatloom-XXXXXX", NULL);
  g_autofree char *path = g_build_filename (folder, "large.heatloom", NULL);
  g_assert_false (hl_plant_save (plant, "/no/such/folder/a.heatloom", &error));
  g_assert_true (g_error_matches (error, HL_PLANT_ERROR, HL_PLANT_ERROR_FILE));
  assert_message (&error, "/no/such/folder/a.heatloom could not be saved");
  g_assert_null (hl_plant_load ("/no/such/file.heatloom", &error));
  g_assert_true (g_error_matches (error, HL_PLANT_ERROR, HL_PLANT_ERROR_FILE));
  assert_message (&error, "/no/such/file.heatloom could not be read");
  g_assert_null (hl_plant_load (folder, &error));
  assert_message (&error, "is a folder");
  g_assert_true (g_file_set_contents (path, "{", 1, NULL));
  g_assert_cmpint (truncate (path, 17 * 1024 * 1024), ==, 0);
  g_assert_null (hl_plant_load (path, &error));
  assert_message (&error, "large.heatloom: larger than 16 MiB");
  g_unlink (path);
  g_rmdir (folder);
}

int
main (int argc, char **argv)
{
  g_test_init (&argc, &argv, NULL);
  g_test_add_func ("/plant-json-write/write-read-write-is-identical", test_write_read_write_is_identical);
  g_test_add_func ("/plant-json-write/all-kinds-come-back", test_all_kinds_come_back);
  g_test_add_func ("/plant-json-write/numbers-keep-every-bit", test_numbers_keep_every_bit);
  g_test_add_func ("/plant-json-write/equality-sees-changes", test_equality_sees_changes);
  g_test_add_func ("/plant-json-write/saving-and-loading", test_saving_and_loading);
  g_test_add_func ("/plant-json-write/file-errors-name-the-file", test_file_errors_name_the_file);
  return g_test_run ();
}
