/* Counting what lies under a box.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "draw/free-space.h"

static HlFreeSpace *
make_space (void)
{
  static const HlGridPoint bent[] = { { 0, 0 }, { 10, 0 }, { 10, 5 } };
  HlFreeSpace *space = hl_free_space_new (-20, -20, 40, 40);
  hl_free_space_add_box (space, 20, 20, 24, 23);      /* 5 x 4 points */
  hl_free_space_add_line (space, bent, 3);
  hl_free_space_close (space);
  return space;
}

static void
test_counts_symbols_and_lines (void)
{
  g_autoptr (HlFreeSpace) space = make_space ();
  const HlBox all = { -100, -100, 450, 450 }, part = { 195, 195, 20, 20 }, corner = { 95, -5, 10, 10 }, beside = { 5, 5, 80, 30 };
  g_assert_cmpint (hl_free_space_boxes (space, &all, 0.0), ==, 20);
  g_assert_cmpint (hl_free_space_boxes (space, &part, 0.0), ==, 4);     /* 20 and 21 across and down */
  g_assert_cmpint (hl_free_space_lines (space, &all, 0.0), ==, 11 + 6);
  g_assert_cmpint (hl_free_space_lines (space, &corner, 0.0), ==, 2);   /* the corner counts for both pieces */
  g_assert_cmpint (hl_free_space_lines (space, &beside, 0.0), ==, 0);
  g_assert_cmpint (hl_free_space_lines (space, &beside, 5.0), ==, 10);   /* 0 to 9 on the row above */
}

static void
test_own_line_is_counted_alike (void)
{
  static const HlGridPoint bent[] = { { 0, 0 }, { 10, 0 }, { 10, 5 } };
  g_autoptr (HlFreeSpace) space = make_space ();
  for (int x = -30; x < 130; x += 7)
    for (int y = -30; y < 80; y += 7)
      {
        HlBox box = { x, y, 36, 22 };
        g_assert_cmpint (hl_free_space_lines (space, &box, 4.0), ==, hl_count_line_points (bent, 3, &box, 4.0));
      }
}

static void
test_words_take_and_give_back (void)
{
  g_autoptr (HlFreeSpace) space = make_space ();
  const HlBox a = { 0, 0, 100, 20 }, b = { 50, 10, 100, 20 }, far = { 300, 300, 10, 10 };
  g_assert_cmpfloat (hl_free_space_taken (space, &b, 0.0), <=, 0.0);
  hl_free_space_take (space, 1, &a);
  g_assert_cmpfloat (hl_free_space_taken (space, &b, 0.0), >=, 500.0);  /* 50 x 10; what spans two tiles counts twice */
  g_assert_cmpfloat (hl_free_space_taken (space, &far, 0.0), <=, 0.0);
  hl_free_space_take (space, 2, &far);
  hl_free_space_give_back (space, 1, &a);
  g_assert_cmpfloat (hl_free_space_taken (space, &b, 0.0), <=, 0.0);
  g_assert_cmpfloat (hl_free_space_taken (space, &far, 0.0), >, 0.0);
}

/* A plant strewn over a vast field has no chart, and must not need one. */
static void
test_vast_field_is_not_charted (void)
{
  g_autoptr (HlFreeSpace) space = hl_free_space_new (-100000000, -100000000, 100000000, 100000000);
  const HlBox a = { 0, 0, 100, 20 };
  hl_free_space_add_box (space, 0, 0, 4, 4);
  hl_free_space_close (space);
  g_assert_cmpint (hl_free_space_boxes (space, &a, 0.0), ==, 0);
  hl_free_space_take (space, 1, &a);
  g_assert_cmpfloat (hl_free_space_taken (space, &a, 0.0), >, 0.0);
}

int
main (int argc, char **argv)
{
  g_test_init (&argc, &argv, NULL);
  g_test_add_func ("/draw/free-space/counts-symbols-and-lines", test_counts_symbols_and_lines);
  g_test_add_func ("/draw/free-space/own-line-is-counted-alike", test_own_line_is_counted_alike);
  g_test_add_func ("/draw/free-space/words-take-and-give-back", test_words_take_and_give_back);
  g_test_add_func ("/draw/free-space/vast-field-is-not-charted", test_vast_field_is_not_charted);
  return g_test_run ();
}
