/* The session: history, selection, file and preview keep what they promise.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "app/hl-edit.h"
#include "app/hl-session.h"
#include <glib/gstdio.h>

static const char *
add (HlSession *session, const char *kind, int x, int y)
{
  const char *id;
  HlPlant *plant = hl_edit_add (hl_session_plant (session), hl_kind_lookup (kind), x, y, &id);
  hl_session_apply (session, "Add", plant, NULL, TRUE);
  return id;
}

static void
undo_all (HlSession *session)
{
  while (hl_session_can_undo (session))
    hl_session_undo (session);
}

static void
redo_all (HlSession *session)
{
  while (hl_session_can_redo (session))
    hl_session_redo (session);
}

static const char *
random_component (HlSession *session, GRand *rand)
{
  HlPlant *plant = hl_session_plant (session);
  guint n = hl_plant_n_components (plant);
  return n > 0 ? hl_plant_component (plant, (guint) g_rand_int_range (rand, 0, (int) n))->id : NULL;
}

static HlPlant *
random_line (HlSession *session, GRand *rand)
{
  HlPlant *plant = hl_session_plant (session);
  const HlComponent *a = hl_plant_find_component (plant, random_component (session, rand));
  const HlComponent *b = hl_plant_find_component (plant, random_component (session, rand));
  guint n_a = hl_component_n_ports (a), n_b = hl_component_n_ports (b);
  if (n_a == 0 || n_b == 0)
    return NULL;
  return hl_edit_connect (plant, a->id, hl_component_port (a, (guint) g_rand_int_range (rand, 0, (int) n_a)).key,
                          b->id, hl_component_port (b, (guint) g_rand_int_range (rand, 0, (int) n_b)).key, NULL, NULL);
}

/* One random edit, of every sort that the window has. */
static void
random_edit (HlSession *session, GRand *rand)
{
  HlPlant *plant = hl_session_plant (session), *next = NULL;
  const char *id = random_component (session, rand);
  int choice = id == NULL ? 0 : g_rand_int_range (rand, 0, 9);
  g_autoptr (GPtrArray) copies = g_ptr_array_new ();

  if (choice <= 1)
    next = hl_edit_add (plant, hl_kind_nth ((guint) g_rand_int_range (rand, 0, (int) hl_kind_count ())),
                        g_rand_int_range (rand, -50, 50), g_rand_int_range (rand, -50, 50), NULL);
  else if (choice == 2)
    next = hl_edit_move (plant, &id, 1, g_rand_int_range (rand, -9, 9), g_rand_int_range (rand, -9, 9));
  else if (choice == 3)
    next = hl_edit_turn (plant, &id, 1);
  else if (choice == 4)
    next = hl_edit_mirror (plant, &id, 1);
  else if (choice == 5)
    next = random_line (session, rand);
  else if (choice == 6)
    next = hl_edit_join_shaft (plant, id, random_component (session, rand), NULL);
  else if (choice == 7 && hl_plant_n_components (plant) < 30)
    next = hl_edit_duplicate (plant, &id, 1, 3, 3, copies);
  else if (choice == 8 && g_rand_int_range (rand, 0, 3) == 0)
    next = hl_edit_delete (plant, &id, 1);
  if (next != NULL)
    hl_session_apply (session, "Random", next, NULL, g_rand_boolean (rand));
}

static void
test_undo_of_everything_gives_the_first_plant_back (void)
{
  for (guint32 seed = 1; seed <= 8; seed++)
    {
      GRand *rand = g_rand_new_with_seed (seed);
      g_autoptr (HlSession) session = hl_session_new ();
      g_autoptr (HlPlant) first = hl_plant_ref (hl_session_plant (session)), last = NULL;
      for (int n = 0; n < 120; n++)
        random_edit (session, rand);
      last = hl_plant_ref (hl_session_plant (session));
      g_assert_false (hl_plant_equal (first, last));
      undo_all (session);
      g_assert_true (hl_plant_equal (hl_session_plant (session), first));
      g_assert_true (hl_solution_plant (hl_session_solution (session)) == hl_session_plant (session));
      redo_all (session);
      g_assert_true (hl_plant_equal (hl_session_plant (session), last));
      g_assert_true (hl_solution_plant (hl_session_solution (session)) == hl_session_plant (session));
      g_rand_free (rand);
    }
}

static void
test_a_new_step_forgets_what_could_be_redone (void)
{
  g_autoptr (HlSession) session = hl_session_new ();
  add (session, "pump", 0, 0);
  add (session, "turbine", 9, 0);
  g_assert_null (hl_session_redo_name (session));
  hl_session_undo (session);
  g_assert_cmpstr (hl_session_redo_name (session), ==, "Add");
  hl_session_apply (session, "Other", hl_edit_add (hl_session_plant (session), hl_kind_lookup ("valve"), 0, 9, NULL), NULL, FALSE);
  g_assert_false (hl_session_can_redo (session));
  g_assert_cmpstr (hl_session_undo_name (session), ==, "Other");
}

static void
test_the_history_is_bounded (void)
{
  g_autoptr (HlSession) session = hl_session_new ();
  const char *id = add (session, "pump", 0, 0);
  guint n = 0;
  for (int k = 0; k < 700; k++)
    hl_session_apply (session, "Move", hl_edit_move (hl_session_plant (session), &id, 1, 1, 0), NULL, FALSE);
  while (hl_session_can_undo (session))
    {
      hl_session_undo (session);
      n++;
    }
  g_assert_cmpuint (n, >=, 100);
  g_assert_cmpuint (n, <, 700);
  g_assert_cmpint (hl_plant_find_component (hl_session_plant (session), id)->x, ==, 700 - (int) n);
}

static void
test_the_selection_never_names_what_is_gone (void)
{
  g_autoptr (HlSession) session = hl_session_new ();
  const char *pump = add (session, "pump", 0, 0), *turbine = add (session, "turbine", 9, 0);
  const char *both[] = { pump, turbine, "X9" };
  guint n;

  hl_session_select_many (session, both, 3);
  hl_session_selection (session, &n);
  g_assert_cmpuint (n, ==, 2);
  hl_session_apply (session, "Delete", hl_edit_delete (hl_session_plant (session), &pump, 1), NULL, TRUE);
  g_assert_false (hl_session_is_selected (session, pump));
  g_assert_true (hl_session_is_selected (session, turbine));
  undo_all (session);
  hl_session_selection (session, &n);
  g_assert_cmpuint (n, ==, 0);
  hl_session_select (session, "X9", FALSE);
  hl_session_selection (session, &n);
  g_assert_cmpuint (n, ==, 0);
}

static void
test_extending_adds_and_takes_away (void)
{
  g_autoptr (HlSession) session = hl_session_new ();
  const char *pump = add (session, "pump", 0, 0), *turbine = add (session, "turbine", 9, 0);
  hl_session_select (session, pump, FALSE);
  hl_session_select (session, turbine, TRUE);
  g_assert_true (hl_session_is_selected (session, pump) && hl_session_is_selected (session, turbine));
  hl_session_select (session, pump, TRUE);
  g_assert_false (hl_session_is_selected (session, pump));
  hl_session_select (session, NULL, FALSE);
  g_assert_false (hl_session_is_selected (session, turbine));
}

static void
test_a_preview_leaves_no_step (void)
{
  g_autoptr (HlSession) session = hl_session_new ();
  const char *id = add (session, "pump", 0, 0);
  g_autoptr (HlPlant) before = hl_plant_ref (hl_session_plant (session));
  for (int k = 1; k < 9; k++)
    hl_session_preview (session, hl_edit_move (before, &id, 1, k, 0), k % 2 == 0);
  g_assert_cmpint (hl_plant_find_component (hl_session_plant (session), id)->x, ==, 8);
  hl_session_cancel_preview (session);
  g_assert_true (hl_session_plant (session) == before);
  hl_session_undo (session);
  g_assert_cmpuint (hl_plant_n_components (hl_session_plant (session)), ==, 0);
  g_assert_false (hl_session_can_undo (session));
}

static void
test_a_typo_keeps_the_plant_and_the_history (void)
{
  g_autoptr (HlSession) session = hl_session_new ();
  const char *id = add (session, "turbine", 0, 0);
  g_autoptr (HlPlant) before = hl_plant_ref (hl_session_plant (session));
  HlAddress address = hl_address_component (id, g_intern_static_string ("isentropic_efficiency"));
  static const char *const wrong[] = { "abc", "0.8 bar", "1.4", "-0.2", "nan", "=X7.outlet.p", "0.8.1" };
  for (guint n = 0; n < G_N_ELEMENTS (wrong); n++)
    {
      g_autoptr (GError) error = NULL;
      g_assert_false (hl_session_set_text (session, &address, wrong[n], &error));
      g_assert_nonnull (error);
      g_assert_cmpuint (strlen (error->message), >, 10);
      g_assert_true (hl_session_plant (session) == before);
    }
}

static void
test_a_typed_value_is_given_and_an_empty_one_let_go (void)
{
  g_autoptr (HlSession) session = hl_session_new ();
  const char *id = add (session, "turbine", 0, 0);
  HlAddress address = hl_address_component (id, g_intern_static_string ("inlet.p"));
  const HlValue *value;
  GError *error = NULL;

  g_assert_true (hl_session_set_text (session, &address, " 80 bar ", &error));
  g_assert_no_error (error);
  value = hl_plant_value (hl_session_plant (session), &address);
  g_assert_nonnull (value);
  g_assert_cmpint (value->origin, ==, HL_ORIGIN_GIVEN);
  g_assert_cmpfloat_with_epsilon (value->value, 80e5, 1e-6);
  g_assert_nonnull (strstr (hl_session_undo_name (session), id));
  g_assert_true (hl_session_set_text (session, &address, "", &error));
  g_assert_no_error (error);
  value = hl_plant_value (hl_session_plant (session), &address);
  g_assert_true (value == NULL || value->origin != HL_ORIGIN_GIVEN);
}

static void
test_saving_and_opening_keep_the_plant (void)
{
  g_autoptr (HlSession) session = hl_session_new (), other = hl_session_new ();
  g_autofree char *folder = g_dir_make_tmp ("heatloom-session-XXXXXX", NULL);
  g_autofree char *path = g_build_filename (folder, "small.heatloom", NULL);
  GError *error = NULL;

  g_assert_false (hl_session_is_dirty (session));
  g_assert_false (hl_session_save (session, NULL, &error));      /* it has no file yet */
  g_assert_nonnull (error);
  g_clear_error (&error);
  add (session, "pump", 4, 4);
  add (session, "turbine", 14, 4);
  g_assert_true (hl_session_is_dirty (session));
  g_assert_true (hl_session_save (session, path, &error));
  g_assert_no_error (error);
  g_assert_false (hl_session_is_dirty (session));
  g_assert_cmpstr (hl_session_path (session), ==, path);
  g_assert_true (hl_session_open (other, path, &error));
  g_assert_no_error (error);
  g_assert_true (hl_plant_equal (hl_session_plant (other), hl_session_plant (session)));
  g_assert_false (hl_session_can_undo (other));
  hl_session_undo (session);
  g_assert_true (hl_session_is_dirty (session));                 /* the file holds more */
  hl_session_redo (session);
  g_assert_false (hl_session_is_dirty (session));
  g_remove (path);
  g_rmdir (folder);
}

static void
test_a_file_that_cannot_be_opened_changes_nothing (void)
{
  g_autoptr (HlSession) session = hl_session_new ();
  g_autofree char *folder = g_dir_make_tmp ("heatloom-session-XXXXXX", NULL);
  g_autofree char *path = g_build_filename (folder, "cut.heatloom", NULL);
  g_autoptr (HlPlant) before = NULL;
  GError *error = NULL;

  add (session, "pump", 4, 4);
  before = hl_plant_ref (hl_session_plant (session));
  g_assert_false (hl_session_open (session, "/nowhere/at/all.heatloom", &error));
  g_assert_nonnull (error);
  g_clear_error (&error);
  g_assert_true (g_file_set_contents (path, "{\"heatloom\": 1, \"components\": [", -1, NULL));
  g_assert_false (hl_session_open (session, path, &error));
  g_assert_nonnull (error);
  g_clear_error (&error);
  g_assert_true (hl_session_plant (session) == before);
  g_assert_true (hl_session_can_undo (session));
  g_assert_null (hl_session_path (session));
  g_remove (path);
  g_rmdir (folder);
}

static void
nudge (HlSession *session, const char *id)
{
  hl_session_apply_again (session, "Move", hl_edit_move (hl_session_plant (session), &id, 1, 1, 0));
}

static void
test_a_held_key_makes_one_step (void)
{
  g_autoptr (HlSession) session = hl_session_new ();
  const char *id = add (session, "pump", 0, 0);
  for (int n = 0; n < 5; n++)
    nudge (session, id);
  g_assert_cmpint (hl_plant_find_component (hl_session_plant (session), id)->x, ==, 5);
  hl_session_undo (session);
  g_assert_cmpint (hl_plant_find_component (hl_session_plant (session), id)->x, ==, 0);
  hl_session_redo (session);
  nudge (session, id);             /* after something else it is a step of its own */
  g_assert_cmpint (hl_plant_find_component (hl_session_plant (session), id)->x, ==, 6);
  hl_session_undo (session);
  g_assert_cmpint (hl_plant_find_component (hl_session_plant (session), id)->x, ==, 5);
}

static void
count_cb (HlSession *session, guint *count)
{
  (*count)++;
}

static void
test_one_step_is_one_change (void)
{
  g_autoptr (HlSession) session = hl_session_new ();
  guint changed = 0, previewed = 0;
  const char *id;
  g_signal_connect (session, "changed", G_CALLBACK (count_cb), &changed);
  g_signal_connect (session, "previewed", G_CALLBACK (count_cb), &previewed);
  id = add (session, "pump", 0, 0);
  g_assert_cmpuint (changed, ==, 1);
  hl_session_preview (session, hl_edit_move (hl_session_plant (session), &id, 1, 1, 0), FALSE);
  g_assert_cmpuint (changed, ==, 1);
  g_assert_cmpuint (previewed, ==, 1);
  hl_session_undo (session);
  g_assert_cmpuint (changed, ==, 2);
}

int
main (int argc, char **argv)
{
  g_test_init (&argc, &argv, NULL);
  g_test_add_func ("/app/session/undo-everything", test_undo_of_everything_gives_the_first_plant_back);
  g_test_add_func ("/app/session/new-step-forgets-redo", test_a_new_step_forgets_what_could_be_redone);
  g_test_add_func ("/app/session/bounded", test_the_history_is_bounded);
  g_test_add_func ("/app/session/selection-valid", test_the_selection_never_names_what_is_gone);
  g_test_add_func ("/app/session/selection-extends", test_extending_adds_and_takes_away);
  g_test_add_func ("/app/session/preview", test_a_preview_leaves_no_step);
  g_test_add_func ("/app/session/typo", test_a_typo_keeps_the_plant_and_the_history);
  g_test_add_func ("/app/session/typed-value", test_a_typed_value_is_given_and_an_empty_one_let_go);
  g_test_add_func ("/app/session/file", test_saving_and_opening_keep_the_plant);
  g_test_add_func ("/app/session/bad-file", test_a_file_that_cannot_be_opened_changes_nothing);
  g_test_add_func ("/app/session/held-key", test_a_held_key_makes_one_step);
  g_test_add_func ("/app/session/signals", test_one_step_is_one_change);
  return g_test_run ();
}
