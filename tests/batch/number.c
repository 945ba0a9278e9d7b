/* Numbers for machines must read back to the same value, in as few digits as that takes.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "batch/number.h"

#include <float.h>
#include <math.h>
#include <string.h>

static void
assert_prints (double value, const char *expected)
{
  char text[HL_NUMBER_SIZE];
  gsize length = hl_number_print (value, text);
  g_assert_cmpstr (text, ==, expected);
  g_assert_cmpuint (length, ==, strlen (expected));
}

static void
test_known_numbers_are_short (void)
{
  assert_prints (0.0, "0");
  assert_prints (1.0, "1");
  assert_prints (-2.5, "-2.5");
  assert_prints (0.83, "0.83");
  assert_prints (753.15, "753.15");
  assert_prints (8e6, "8000000");
  assert_prints (0.1, "0.1");
  assert_prints (1e-3, "0.001");
  assert_prints (2.0 / 3.0, "0.6666666666666666");
  assert_prints (0.1 + 0.2, "0.30000000000000004");
  assert_prints (1e22, "1e+22");
  assert_prints (DBL_MAX, "1.7976931348623157e+308");
  assert_prints (1.0 - DBL_EPSILON / 2.0, "0.9999999999999999");
}

static void
test_every_number_reads_back (void)
{
  GRand *random = g_rand_new_with_seed (20260);
  for (int i = 0; i < 300000; i++)
    {
      char text[HL_NUMBER_SIZE];
      double value = exp (g_rand_double_range (random, -40.0, 60.0)) * (i % 2 == 0 ? 1.0 : -1.0), read;
      if (i % 5 == 0)
        value = floor (1000.0 * value) / 1000.0;
      g_assert_cmpuint (hl_number_print (value, text), <, HL_NUMBER_SIZE);
      g_assert_true (hl_number_read (text, &read));
      if (memcmp (&read, &value, sizeof value) != 0)
        g_error ("%.17g is printed as %s", value, text);
    }
  g_rand_free (random);
}

static void
test_only_whole_numbers_are_read (void)
{
  static const char *const wrong[] = { "", " ", "bar", "1,5", "1.5 bar", "1.5.2", "nan", "inf", "1e999", "--1" };
  static const struct { const char *text; double value; } right[] = {
    { "1.5", 1.5 }, { " 8e6 ", 8e6 }, { "-3", -3.0 }, { "+.5", 0.5 }, { "1E-3", 1e-3 },
  };
  double value = 7.0;
  for (guint i = 0; i < G_N_ELEMENTS (wrong); i++)
    if (hl_number_read (wrong[i], &value))
      g_error ("“%s” was read as %g", wrong[i], value);
  g_assert_cmpfloat (value, ==, 7.0);
  for (guint i = 0; i < G_N_ELEMENTS (right); i++)
    {
      g_assert_true (hl_number_read (right[i].text, &value));
      g_assert_cmpfloat (value, ==, right[i].value);
    }
}

int
main (int argc, char **argv)
{
  g_test_init (&argc, &argv, NULL);
  g_test_add_func ("/number/known-numbers-are-short", test_known_numbers_are_short);
  g_test_add_func ("/number/every-number-reads-back", test_every_number_reads_back);
  g_test_add_func ("/number/only-whole-numbers-are-read", test_only_whole_numbers_are_read);
  return g_test_run ();
}
