/* Sums of n x^I y^J with their derivatives, unrolled at compile time.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#pragma once
#include <glib.h>
G_BEGIN_DECLS

/* One term of an equation's table; terms of equal I stand together. */
typedef struct { signed char I, J; double n; } HlIf97Term;

/* Sums over n x^I y^J of the factors named: i stands for I, ii for I (I - 1),
 * jjj for J (J - 1) (J - 2).  Divided by powers of x and y they are the
 * derivatives. */
typedef struct { double one, i, ii, j, jj, ij; } HlIf97Sums;
typedef struct { double one, j, jj, jjj; } HlIf97SumsY;

#define HL_IF97_INLINE static inline __attribute__ ((always_inline))

/* Everything below is always inlined with constant tables, so that the
 * compiler unrolls the loops whole, folds the exponents into the code and
 * drops the powers that no term asks for.  A power is the product of the two
 * nearest halves: few roundings, and a short chain for the processor. */
HL_IF97_INLINE void
hl_if97_powers (double x, int lowest, int highest, double *power)
{
  power[0] = 1.0;
  if (highest >= 1)
    power[1] = x;
#pragma GCC unroll 64
  for (int k = 2; k <= highest; k++)
    power[k] = power[k / 2] * power[k - k / 2];
  if (lowest <= -1)
    power[-1] = 1.0 / x;
#pragma GCC unroll 64
  for (int k = 2; k <= -lowest; k++)
    power[-k] = power[-(k / 2)] * power[-(k - k / 2)];
}

/* Does term k close its group of equal I? */
#define HL_IF97_GROUP_ENDS(terms, n, k) ((k) + 1 == (n) || (terms)[(k) + 1].I != (terms)[k].I)
#define HL_IF97_GROUP_STARTS(terms, k) ((k) == 0 || (terms)[(k) - 1].I != (terms)[k].I)

HL_IF97_INLINE double
hl_if97_sum (const HlIf97Term *terms, int n, const double *x, const double *y)
{
  double sum = 0.0, group = 0.0;
#pragma GCC unroll 64
  for (int k = 0; k < n; k++)
    {
      double t = terms[k].n * y[terms[k].J];
      group = HL_IF97_GROUP_STARTS (terms, k) ? t : group + t;
      if (HL_IF97_GROUP_ENDS (terms, n, k))
        sum += x[terms[k].I] * group;
    }
  return sum;
}

HL_IF97_INLINE void
hl_if97_sums (const HlIf97Term *terms, int n, const double *x, const double *y, HlIf97Sums *sums)
{
  HlIf97Sums total = { 0 };
  double g = 0.0, gj = 0.0, gjj = 0.0;
#pragma GCC unroll 64
  for (int k = 0; k < n; k++)
    {
      double I = terms[k].I, J = terms[k].J, power = y[terms[k].J];
      double t = terms[k].n * power, tj = (terms[k].n * J) * power, tjj = (terms[k].n * (J * (J - 1.0))) * power;
      gboolean starts = HL_IF97_GROUP_STARTS (terms, k);
      g = starts ? t : g + t;
      gj = starts ? tj : (terms[k].J == 0 ? gj : gj + tj);
      gjj = starts ? tjj : (terms[k].J == 0 || terms[k].J == 1 ? gjj : gjj + tjj);
      if (HL_IF97_GROUP_ENDS (terms, n, k))
        {
          double px = x[terms[k].I];
          g *= px;
          gj *= px;
          total.one += g;
          total.j += gj;
          total.jj += gjj * px;
          if (terms[k].I != 0)
            {
              total.i += I * g;
              total.ij += I * gj;
            }
          if (terms[k].I != 0 && terms[k].I != 1)
            total.ii += (I * (I - 1.0)) * g;
        }
    }
  *sums = total;
}

HL_IF97_INLINE void
hl_if97_sums_y (const HlIf97Term *terms, int n, const double *x, const double *y, HlIf97SumsY *sums)
{
  HlIf97SumsY total = { 0 };
  double g = 0.0, gj = 0.0, gjj = 0.0, gjjj = 0.0;
#pragma GCC unroll 64
  for (int k = 0; k < n; k++)
    {
      double J = terms[k].J, power = y[terms[k].J], c = terms[k].n;
      double t = c * power, tj = (c * J) * power, tjj = (c * (J * (J - 1.0))) * power,
             tjjj = (c * (J * (J - 1.0) * (J - 2.0))) * power;
      gboolean starts = HL_IF97_GROUP_STARTS (terms, k);
      int j = terms[k].J;
      g = starts ? t : g + t;
      gj = starts ? tj : (j == 0 ? gj : gj + tj);
      gjj = starts ? tjj : (j == 0 || j == 1 ? gjj : gjj + tjj);
      gjjj = starts ? tjjj : (j == 0 || j == 1 || j == 2 ? gjjj : gjjj + tjjj);
      if (HL_IF97_GROUP_ENDS (terms, n, k))
        {
          double px = x[terms[k].I];
          total.one += g * px;
          total.j += gj * px;
          total.jj += gjj * px;
          total.jjj += gjjj * px;
        }
    }
  *sums = total;
}

G_END_DECLS
