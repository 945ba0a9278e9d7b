/* Dense linear systems: solved, and singular ones recognised with their null space.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "engine/dense.h"
#include <math.h>
#include <string.h>

/* Random systems whose answer is known beforehand. */
static void
test_solves (void)
{
  g_autoptr (GRand) rand = g_rand_new_with_seed (5);
  for (int n = 1; n <= 20; n++)
    {
      double a[400], b[20], x[20];
      int pivot[20];
      for (int i = 0; i < n; i++)
        x[i] = g_rand_double_range (rand, -5.0, 5.0);
      for (int i = 0; i < n; i++)
        {
          b[i] = 0.0;
          for (int j = 0; j < n; j++)
            {
              a[i * n + j] = g_rand_double_range (rand, -1.0, 1.0) * (i == j ? 0.0 : 1.0);   /* zeros on the diagonal ask for pivoting */
              if (n == 1)
                a[0] = 3.0;
              b[i] += a[i * n + j] * x[j];
            }
        }
      if (n == 2 && !(fabs (a[1] * a[2]) > 1e-3))
        continue;
      g_assert_cmpint (hl_dense_factor (n, a, pivot, 1e-14), ==, 0);
      hl_dense_solve (n, a, pivot, b);
      for (int i = 0; i < n; i++)
        g_assert_cmpfloat (fabs (b[i] - x[i]), <, 1e-8);
    }
}

/* Third row = first + second; what it shrinks is (1, -2, 1). */
static void
test_singular (void)
{
  double a[] = { 1, 2, 3, 4, 5, 6, 5, 7, 9 }, v[3];
  int pivot[3];
  g_assert_cmpint (hl_dense_factor (3, a, pivot, 1e-14), ==, 1);
  g_assert_cmpfloat (hl_dense_null (3, a, pivot, v), <, 1e-10);
  g_assert_cmpfloat (fabs (v[0] / v[1] + 0.5), <, 1e-9);
  g_assert_cmpfloat (fabs (v[2] / v[1] + 0.5), <, 1e-9);
}

int
main (int argc, char **argv)
{
  g_test_init (&argc, &argv, NULL);
  g_test_add_func ("/engine/dense/solves", test_solves);
  g_test_add_func ("/engine/dense/singular", test_singular);
  return g_test_run ();
}
