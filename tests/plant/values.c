/* Lists of values: order, replacement, removal.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "plant/component-private.h"
#include "plant-test.h"

static void
test_values_stay_sorted_and_unique (void)
{
  static const char *const keys[] = { "m", "a", "z", "inlet.p", "inlet.T", "m", "b" };
  HlValues values = { 0 }, copy;
  for (guint i = 0; i < G_N_ELEMENTS (keys); i++)
    {
      HlValue value = { .origin = HL_ORIGIN_GIVEN, .value = i };
      hl_values_set (&values, keys[i], &value);
    }
  g_assert_cmpuint (values.n, ==, 6);
  for (guint i = 1; i < values.n; i++)
    g_assert_cmpstr (values.entries[i - 1].key, <, values.entries[i].key);
  g_assert_cmpfloat (hl_values_find (&values, "m")->value, ==, 5);
  g_assert_null (hl_values_find (&values, "inlet"));
  hl_values_copy (&copy, &values);
  g_assert_true (hl_values_equal (&copy, &values));
  hl_values_set (&copy, "zz", NULL);
  g_assert_true (hl_values_equal (&copy, &values));
  hl_values_set (&copy, "a", NULL);
  g_assert_null (hl_values_find (&copy, "a"));
  g_assert_nonnull (hl_values_find (&values, "a"));
  g_assert_false (hl_values_equal (&copy, &values));
  hl_values_clear (&copy);
  hl_values_clear (&values);
  g_assert_cmpuint (values.n, ==, 0);
}

static void
test_equality_sees_every_part (void)
{
  HlAddress of = hl_address_stream ("1", "m"), other = hl_address_stream ("2", "m");
  HlValue base = { .origin = HL_ORIGIN_TIED, .tie = hl_tie_linear (&of, 2, 3) };
  HlValue others[4];
  HlValues a = { 0 };
  for (int i = 0; i < 4; i++)
    others[i] = base;
  others[0].origin = HL_ORIGIN_GIVEN;
  others[1].tie = hl_tie_linear (&of, 2.5, 3);
  others[2].tie = hl_tie_linear (&of, 2, 4);
  others[3].tie = hl_tie_linear (&other, 2, 3);
  hl_values_set (&a, "m", &base);
  for (int i = 0; i < 4; i++)
    {
      HlValues b = { 0 };
      hl_values_set (&b, "m", &others[i]);
      g_assert_false (hl_values_equal (&a, &b));
      hl_values_set (&b, "m", &base);
      g_assert_true (hl_values_equal (&a, &b));
      hl_values_clear (&b);
    }
  hl_values_clear (&a);
}

static void
test_origins_have_words (void)
{
  g_assert_cmpstr (hl_origin_id (HL_ORIGIN_FOUND), ==, "found");
  g_assert_cmpstr (hl_origin_id (HL_ORIGIN_GIVEN), ==, "given");
  g_assert_cmpstr (hl_origin_id (HL_ORIGIN_ASSUMED), ==, "assumed");
  g_assert_cmpstr (hl_origin_id (HL_ORIGIN_TIED), ==, "tied");
  for (int i = 0; i < 4; i++)
    g_assert_cmpuint (strlen (hl_origin_name ((HlOrigin) i)), >, 0);
}

int
main (int argc, char **argv)
{
  g_test_init (&argc, &argv, NULL);
  g_test_add_func ("/values/stay-sorted-and-unique", test_values_stay_sorted_and_unique);
  g_test_add_func ("/values/equality-sees-every-part", test_equality_sees_every_part);
  g_test_add_func ("/values/origins-have-words", test_origins_have_words);
  return g_test_run ();
}
