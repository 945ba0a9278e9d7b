/* Unsaved work survives a kill at any moment, and leaves nothing behind after a good end.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "app/hl-autosave.h"
#include "app/hl-edit.h"
#include <glib/gstdio.h>
#include <signal.h>
#include <string.h>
#include <sys/wait.h>

#define DELAY 5

static const char *own_program;

static void
edit (HlSession *session)
{
  HlPlant *plant = hl_edit_add (hl_session_plant (session), hl_kind_lookup ("pump"), 0, 0, NULL);
  hl_session_apply (session, "Add", plant, NULL, FALSE);
}

static void
spin (guint milliseconds)
{
  gint64 end = g_get_monotonic_time () + milliseconds * 1000;
  while (g_get_monotonic_time () < end)
    if (!g_main_context_iteration (NULL, FALSE))
      g_usleep (500);
}

static guint
n_files (const char *folder)
{
  GDir *dir = g_dir_open (folder, 0, NULL);
  guint n = 0;
  while (dir != NULL && g_dir_read_name (dir) != NULL)
    n++;
  if (dir != NULL)
    g_dir_close (dir);
  return n;
}

static void
wait_for_files (const char *folder, guint n)
{
  for (int i = 0; i < 1000 && n_files (folder) != n; i++)
    spin (5);
  g_assert_cmpuint (n_files (folder), ==, n);
}

/* What the killed process does: edits for ever. */
static int
edit_until_killed (const char *path)
{
  HlSession *session = hl_session_new ();
  g_autoptr (HlAutosave) autosave = hl_autosave_new (session, DELAY);
  if (!hl_session_open (session, path, NULL))
    return 1;
  for (;;)
    {
      if (hl_plant_n_components (hl_session_plant (session)) > 40)
        hl_session_undo (session);
      edit (session);
      spin (3);
    }
}

static char *
saved_plant (const char *folder)
{
  g_autoptr (HlSession) session = hl_session_new ();
  char *path = g_build_filename (folder, "loop.heatloom", NULL);
  edit (session);
  g_assert_true (hl_session_save (session, path, NULL));
  return path;
}

static void
empty_folder (const char *folder)
{
  GDir *dir = g_dir_open (folder, 0, NULL);
  const char *name;
  while ((name = g_dir_read_name (dir)) != NULL)
    {
      g_autofree char *path = g_build_filename (folder, name, NULL);
      g_unlink (path);
    }
  g_dir_close (dir);
  g_rmdir (folder);
}

static void
kill_at (const char *path, guint milliseconds)
{
  g_autoptr (GError) error = NULL;
  const char *argv[] = { own_program, "--edit", path, NULL };
  GPid child;
  int status;
  g_spawn_async (NULL, (char **) argv, NULL, G_SPAWN_DO_NOT_REAP_CHILD, NULL, NULL, &child, &error);
  g_assert_no_error (error);
  /* The moment counts from the first time that something was kept. */
  for (int i = 0; i < 2000; i++)
    {
      g_autofree char *folder = g_path_get_dirname (path);
      if (n_files (folder) > 1)
        break;
      g_usleep (5000);
    }
  g_usleep (milliseconds * 1000);
  kill (child, SIGKILL);
  g_assert_cmpint (waitpid (child, &status, 0), ==, child);
  g_assert_true (WIFSIGNALED (status));
}

/* Whenever the kill comes, what is found is a whole plant with more in it than the file, and the file is as it was. */
static void
test_a_kill_at_any_moment_leaves_a_whole_plant (void)
{
  g_autoptr (GRand) rand = g_rand_new_with_seed (20);
  guint n_found = 0;
  for (int n = 0; n < 8; n++)
    {
      g_autofree char *folder = g_dir_make_tmp ("heatloom-XXXXXX", NULL), *path = saved_plant (folder);
      g_autoptr (GPtrArray) found = NULL;
      g_autoptr (HlPlant) file = NULL;

      kill_at (path, (guint) g_rand_int_range (rand, 0, 120));
      found = hl_autosave_find (path);
      n_found += found->len;
      for (guint i = 0; i < found->len; i++)
        {
          g_autoptr (GError) error = NULL;
          g_autoptr (HlPlant) kept = hl_plant_load (g_ptr_array_index (found, i), &error);
          g_assert_no_error (error);
          g_assert_cmpuint (hl_plant_n_components (kept), >, 1);
          hl_autosave_discard (g_ptr_array_index (found, i));
        }
      file = hl_plant_load (path, NULL);
      g_assert_cmpuint (hl_plant_n_components (file), ==, 1);
      empty_folder (folder);
    }
  g_assert_cmpuint (n_found, >=, 6);     /* a kill within the very first writing leaves nothing yet */
}

static void
test_saving_undoing_and_closing_leave_nothing_behind (void)
{
  g_autofree char *folder = g_dir_make_tmp ("heatloom-XXXXXX", NULL), *path = saved_plant (folder);
  HlSession *session = hl_session_new ();
  HlAutosave *autosave = hl_autosave_new (session, DELAY);
  g_autoptr (GPtrArray) found = NULL;

  g_assert_true (hl_session_open (session, path, NULL));
  edit (session);
  wait_for_files (folder, 2);
  found = hl_autosave_find (path);
  g_assert_cmpuint (found->len, ==, 0);      /* of a living process: not offered */
  g_assert_true (hl_session_save (session, NULL, NULL));
  g_assert_cmpuint (n_files (folder), ==, 1);
  edit (session);
  wait_for_files (folder, 2);
  hl_session_undo (session);
  g_assert_cmpuint (n_files (folder), ==, 1);
  edit (session);
  hl_autosave_now (autosave);
  g_assert_cmpuint (n_files (folder), ==, 2);
  hl_autosave_free (autosave);
  spin (30);
  g_assert_cmpuint (n_files (folder), ==, 1);
  g_object_unref (session);
  empty_folder (folder);
}

/* Only a file with the exact form of the name counts, and one that a program left which is gone. */
static void
test_only_what_was_kept_is_found (void)
{
  static const char *const names[] = { ".loop.heatloom.autosave-999999999-1", ".loop.heatloom.autosave-999999999-1.A1B2C3",
                                       ".loop.heatloom.autosave-", ".other.heatloom.autosave-999999999-1" };
  g_autofree char *folder = g_dir_make_tmp ("heatloom-XXXXXX", NULL), *path = saved_plant (folder);
  g_autoptr (GPtrArray) found = NULL;
  for (guint n = 0; n < G_N_ELEMENTS (names); n++)
    {
      g_autofree char *file = g_build_filename (folder, names[n], NULL);
      g_assert_true (g_file_set_contents (file, "{}", -1, NULL));
    }
  found = hl_autosave_find (path);
  g_assert_cmpuint (found->len, ==, 1);
  g_assert_true (g_str_has_suffix (g_ptr_array_index (found, 0), names[0]));
  empty_folder (folder);
}

/* A plant that has no file yet is kept in the user's state folder. */
static void
test_a_plant_without_a_file_is_kept_too (void)
{
  g_autofree char *folder = g_build_filename (g_get_user_state_dir (), "heatloom", NULL);
  g_autoptr (HlSession) session = hl_session_new ();
  g_autoptr (HlAutosave) autosave = hl_autosave_new (session, DELAY);
  guint before = n_files (folder);
  edit (session);
  hl_autosave_now (autosave);
  g_assert_cmpuint (n_files (folder), ==, before + 1);
}

int
main (int argc, char **argv)
{
  own_program = argv[0];
  if (argc == 3 && strcmp (argv[1], "--edit") == 0)
    return edit_until_killed (argv[2]);
  g_test_init (&argc, &argv, NULL);
  g_test_add_func ("/app/autosave/kill", test_a_kill_at_any_moment_leaves_a_whole_plant);
  g_test_add_func ("/app/autosave/good-end", test_saving_undoing_and_closing_leave_nothing_behind);
  g_test_add_func ("/app/autosave/names", test_only_what_was_kept_is_found);
  g_test_add_func ("/app/autosave/no-file", test_a_plant_without_a_file_is_kept_too);
  return g_test_run ();
}
