/* Small dense linear systems, with a look at their null space.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "engine/dense.h"
#include <math.h>

int
hl_dense_factor (int n, double *a, int *pivot, double least)
{
  double largest = 0.0;
  int lifted = 0;
  for (int i = 0; i < n * n; i++)
    largest = fmax (largest, fabs (a[i]));
  double floor_value = largest > 0.0 ? least * largest : least;
  for (int k = 0; k < n; k++)
    {
      int best = k;
      for (int i = k + 1; i < n; i++)
        if (fabs (a[i * n + k]) > fabs (a[best * n + k]))
          best = i;
      pivot[k] = best;
      if (best != k)
        for (int j = 0; j < n; j++)
          {
            double swap = a[k * n + j];
            a[k * n + j] = a[best * n + j];
            a[best * n + j] = swap;
          }
      if (!(fabs (a[k * n + k]) >= floor_value))
        {
          a[k * n + k] = a[k * n + k] < 0.0 ? -floor_value : floor_value;
          lifted++;
        }
      double inverse = 1.0 / a[k * n + k];
      for (int i = k + 1; i < n; i++)
        {
          double f = a[i * n + k];
          if (fpclassify (f) == FP_ZERO)
            continue;
          f *= inverse;
          a[i * n + k] = f;
          for (int j = k + 1; j < n; j++)
            a[i * n + j] -= f * a[k * n + j];
        }
    }
  return lifted;
}

/* Rows were swapped whole, factors included, so all exchanges come first. */
void
hl_dense_solve (int n, const double *a, const int *pivot, double *b)
{
  for (int k = 0; k < n; k++)
    if (pivot[k] != k)
      {
        double swap = b[k];
        b[k] = b[pivot[k]];
        b[pivot[k]] = swap;
      }
  for (int i = 1; i < n; i++)
    for (int j = 0; j < i; j++)
      b[i] -= a[i * n + j] * b[j];
  for (int i = n - 1; i >= 0; i--)
    {
      for (int j = i + 1; j < n; j++)
        b[i] -= a[i * n + j] * b[j];
      b[i] /= a[i * n + i];
    }
}

double
hl_dense_null (int n, const double *a, const int *pivot, double *v)
{
  double shrinkage = 0.0;
  for (int i = 0; i < n; i++)
    v[i] = 1.0 + 0.1 * sin (1.7 * i);
  for (int step = 0; step < 3; step++)
    {
      double largest = 0.0;
      hl_dense_solve (n, a, pivot, v);
      for (int i = 0; i < n; i++)
        largest = fmax (largest, fabs (v[i]));
      if (!(largest > 0.0) || !isfinite (largest))
        return 1.0;
      for (int i = 0; i < n; i++)
        v[i] /= largest;
      shrinkage = 1.0 / largest;
    }
  return shrinkage;
}
