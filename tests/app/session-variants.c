/* Variants in the session: edits go to the one in view, and undoing takes everything back, wherever one looks.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "app/hl-edit.h"
#include "app/hl-session.h"
#include <glib/gstdio.h>
#include "panes.h"
#include <math.h>

static char *
text_of (HlSession *session)
{
  return hl_document_to_json (hl_session_document (session));
}

static void
add_variant (HlSession *session, const char *name, int from)
{
  GError *error = NULL;
  HlDocument *document = hl_document_with_variant (hl_session_document (session), name, from, &error);
  g_assert_no_error (error);
  hl_session_apply_document (session, "Add", document, hl_document_find_variant (document, name));
}

static void
set (HlSession *session, const char *where, const char *text)
{
  HlAddress address;
  GError *error = NULL;
  g_assert_true (hl_address_parse (where, hl_session_plant (session), &address, NULL));
  hl_session_set_text (session, &address, text, &error);
  g_assert_no_error (error);
}

static double
value_in (HlSession *session, int variant, const char *where)
{
  HlPlant *plant = hl_document_plant (hl_session_document (session), variant);
  HlAddress address;
  const HlValue *value;
  g_assert_true (hl_address_parse (where, plant, &address, NULL));
  value = hl_plant_value_wherever (plant, &address, NULL);
  return value != NULL ? value->value : NAN;
}

static void
test_edits_go_to_the_variant_in_view (void)
{
  g_autoptr (HlSession) session = loop_session ();
  add_variant (session, "low", HL_DOCUMENT_BASE);
  g_assert_cmpint (hl_session_variant (session), ==, 0);
  set (session, "T1.exhaust.p", "0.05 bar");
  g_assert_cmpfloat_with_epsilon (value_in (session, 0, "T1.exhaust.p"), 5000, 1e-6);
  g_assert_cmpfloat_with_epsilon (value_in (session, HL_DOCUMENT_BASE, "T1.exhaust.p"), 7000, 1e-6);
  hl_session_show_variant (session, HL_DOCUMENT_BASE);
  g_assert_true (hl_solution_plant (hl_session_solution (session)) == hl_document_plant (hl_session_document (session), HL_DOCUMENT_BASE));
  set (session, "T1.inlet.p", "80 bar");
  g_assert_cmpfloat_with_epsilon (value_in (session, 0, "T1.inlet.p"), 80e5, 1e-3);     /* says nothing of it, so follows */
  hl_session_show_variant (session, 0);
  g_assert_cmpuint (hl_document_changes (hl_session_document (session), 0)->len, ==, 1);
}

/* Looking is no step; undoing returns to where the step was made. */
static void
test_undo_is_independent_of_looking (void)
{
  g_autoptr (HlSession) session = loop_session ();
  g_autofree char *before = text_of (session), *after = NULL, *undone = NULL, *redone = NULL;
  add_variant (session, "low", HL_DOCUMENT_BASE);
  set (session, "T1.exhaust.p", "0.05 bar");
  hl_session_show_variant (session, HL_DOCUMENT_BASE);
  set (session, "T1.inlet.p", "80 bar");
  hl_session_show_variant (session, 0);
  hl_session_show_variant (session, HL_DOCUMENT_BASE);
  hl_session_show_variant (session, 0);
  after = text_of (session);
  hl_session_undo (session);
  g_assert_cmpint (hl_session_variant (session), ==, HL_DOCUMENT_BASE);
  g_assert_cmpfloat_with_epsilon (value_in (session, HL_DOCUMENT_BASE, "T1.inlet.p"), 65e5, 1e-3);
  hl_session_undo (session);
  g_assert_cmpint (hl_session_variant (session), ==, 0);
  g_assert_cmpuint (hl_document_changes (hl_session_document (session), 0)->len, ==, 0);
  hl_session_undo (session);
  g_assert_cmpint (hl_session_variant (session), ==, HL_DOCUMENT_BASE);
  undone = text_of (session);
  g_assert_cmpstr (undone, ==, before);
  g_assert_false (hl_session_can_undo (session));
  g_assert_false (hl_session_is_dirty (session));
  while (hl_session_can_redo (session))
    hl_session_redo (session);
  redone = text_of (session);
  g_assert_cmpstr (redone, ==, after);
}

/* Steps of a held key become one in a variant too, and not across two variants. */
static void
test_close_steps_stay_in_one_variant (void)
{
  g_autoptr (HlSession) session = loop_session ();
  const char *id = "T1";
  add_variant (session, "a", HL_DOCUMENT_BASE);
  for (int i = 0; i < 3; i++)
    hl_session_apply_again (session, "Move", hl_edit_move (hl_session_base (session), &id, 1, 1, 0));
  hl_session_show_variant (session, HL_DOCUMENT_BASE);
  hl_session_apply_again (session, "Move", hl_edit_move (hl_session_base (session), &id, 1, 1, 0));
  g_assert_cmpint (hl_plant_find_component (hl_document_plant (hl_session_document (session), HL_DOCUMENT_BASE), "T1")->x, ==, 21);
  g_assert_cmpint (hl_plant_find_component (hl_document_plant (hl_session_document (session), 0), "T1")->x, ==, 23);
  hl_session_undo (session);
  hl_session_undo (session);
  g_assert_cmpint (hl_plant_find_component (hl_session_plant (session), "T1")->x, ==, 20);
  g_assert_cmpint (hl_session_variant (session), ==, 0);
}

static HlDocument *
random_document (HlSession *session, GRand *rand)
{
  HlDocument *document = hl_session_document (session);
  int n = (int) hl_document_n_variants (document);
  g_autofree char *name = hl_document_free_name (document, "v");
  int choice = n == 0 ? 0 : g_rand_int_range (rand, 0, 5), which = n == 0 ? 0 : g_rand_int_range (rand, 0, n);
  if (choice == 0)
    return hl_document_with_variant (document, name, g_rand_int_range (rand, -1, n), NULL);
  if (choice == 1)
    return hl_document_with_name (document, which, name, NULL);
  if (choice == 2)
    return hl_document_with_order (document, which, g_rand_int_range (rand, 0, n));
  if (choice == 3)
    return hl_document_promoted (document, which);
  return hl_document_without (document, which);
}

/* Any mixture of edits, looks and changes of the list: undone to the first document byte for byte, and redone. */
static void
test_random_work_is_undone (void)
{
  GRand *rand = g_rand_new_with_seed (5);
  for (int round = 0; round < 5; round++)
    {
      g_autoptr (HlSession) session = loop_session ();
      g_autofree char *before = text_of (session), *after = NULL, *undone = NULL, *redone = NULL;
      for (int i = 0; i < 60; i++)
        {
          HlPlant *plant = hl_session_plant (session);
          guint n = hl_plant_n_components (plant);
          const char *id = n > 0 ? hl_plant_component (plant, (guint) g_rand_int_range (rand, 0, (gint32) n))->id : NULL;
          int choice = g_rand_int_range (rand, 0, 8);
          HlDocument *document;
          if (choice < 2)
            {
              document = random_document (session, rand);
              hl_session_apply_document (session, "Random", document, g_rand_int_range (rand, -1, (gint32) hl_document_n_variants (document)));
            }
          else if (choice < 4)
            hl_session_show_variant (session, g_rand_int_range (rand, -1, (gint32) hl_document_n_variants (hl_session_document (session))));
          else if (choice == 4 && id != NULL)
            hl_session_apply (session, "Move", hl_edit_move (plant, &id, 1, 1, -1), NULL, FALSE);
          else if (choice == 5 && id != NULL && g_rand_int_range (rand, 0, 4) == 0)
            hl_session_apply (session, "Delete", hl_edit_delete (plant, &id, 1), NULL, TRUE);
          else if (choice == 6)
            hl_session_apply (session, "Add", hl_edit_add (plant, hl_kind_lookup ("valve"), g_rand_int_range (rand, -9, 9), 40, NULL), NULL, TRUE);
          else if (hl_plant_find_component (plant, "T1") != NULL)
            set (session, "T1.isentropic_efficiency", g_rand_boolean (rand) ? "0.8" : "");
          for (int v = 0; v < (int) hl_document_n_variants (hl_session_document (session)); v++)
            g_assert_nonnull (hl_document_plant (hl_session_document (session), v));
        }
      after = text_of (session);
      while (hl_session_can_undo (session))
        hl_session_undo (session);
      undone = text_of (session);
      g_assert_cmpstr (undone, ==, before);
      while (hl_session_can_redo (session))
        hl_session_redo (session);
      redone = text_of (session);
      g_assert_cmpstr (redone, ==, after);
    }
  g_rand_free (rand);
}

static void
test_variants_are_saved_and_read (void)
{
  g_autoptr (HlSession) session = loop_session (), other = hl_session_new ();
  g_autofree char *path = g_build_filename (g_get_tmp_dir (), "heatloom-session-variants.heatloom", NULL);
  GError *error = NULL;
  add_variant (session, "low", HL_DOCUMENT_BASE);
  set (session, "T1.exhaust.p", "0.05 bar");
  g_assert_true (hl_session_is_dirty (session));
  g_assert_true (hl_session_save (session, path, &error));
  g_assert_false (hl_session_is_dirty (session));
  g_assert_true (hl_session_open (other, path, &error));
  g_assert_no_error (error);
  g_assert_true (hl_document_equal (hl_session_document (session), hl_session_document (other)));
  g_assert_cmpint (hl_session_variant (other), ==, HL_DOCUMENT_BASE);
  hl_session_show_variant (other, 0);
  g_assert_false (hl_session_is_dirty (other));
  set (other, "T1.exhaust.p", "0.06 bar");
  g_assert_true (hl_session_revert (other, &error));
  g_assert_cmpint (hl_session_variant (other), ==, 0);      /* one goes on looking at it */
  g_assert_cmpfloat_with_epsilon (value_in (other, 0, "T1.exhaust.p"), 5000, 1e-6);
  g_unlink (path);
}

/* Marks stand against the base while a variant is in view, else against what is compared with. */
static void
test_reference_of_marks (void)
{
  g_autoptr (HlSession) session = loop_session ();
  const char *name = NULL;
  HlPlant *elsewhere = hl_plant_new ();
  g_assert_null (hl_session_reference (session, NULL));
  add_variant (session, "low", HL_DOCUMENT_BASE);
  g_assert_true (hl_session_reference (session, &name) == hl_document_plant (hl_session_document (session), HL_DOCUMENT_BASE));
  g_assert_cmpstr (name, ==, "Base");
  hl_session_show_variant (session, HL_DOCUMENT_BASE);
  hl_session_compare_variant (session, 0);
  set (session, "T1.inlet.p", "70 bar");
  g_assert_true (hl_session_reference (session, &name) == hl_document_plant (hl_session_document (session), 0));
  g_assert_cmpstr (name, ==, "low");
  hl_session_compare_plant (session, elsewhere, "other.heatloom");
  g_assert_true (hl_session_reference (session, &name) == elsewhere);
  g_assert_cmpstr (name, ==, "other.heatloom");
  g_assert_true (hl_session_is_comparing (session));
  hl_session_compare_end (session);
  g_assert_false (hl_session_is_comparing (session));
  g_assert_null (hl_session_reference (session, NULL));
}

int
main (int argc, char **argv)
{
  g_test_init (&argc, &argv, NULL);
  g_test_add_func ("/session-variants/edits-go-to-the-variant-in-view", test_edits_go_to_the_variant_in_view);
  g_test_add_func ("/session-variants/undo-is-independent-of-looking", test_undo_is_independent_of_looking);
  g_test_add_func ("/session-variants/close-steps-stay-in-one-variant", test_close_steps_stay_in_one_variant);
  g_test_add_func ("/session-variants/random-work-is-undone", test_random_work_is_undone);
  g_test_add_func ("/session-variants/saved-and-read", test_variants_are_saved_and_read);
  g_test_add_func ("/session-variants/reference-of-marks", test_reference_of_marks);
  return g_test_run ();
}
