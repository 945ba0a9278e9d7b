/* Sums of n x^I y^J with their derivatives, unrolled at compile time.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#pragma once
#include <glib.h>
G_BEGIN_DECLS

/* One term of an equation's table; terms of equal I stand together. */
typedef struct { signed char I, J; double n; } HlIf97Term;

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

/* The two halves of a processor's register: two sums advance by one instruction. */
typedef double HlIf97Pair __attribute__ ((vector_size (16)));

/* As hl_if97_powers(), each power twice. */
HL_IF97_INLINE void
hl_if97_pair_powers (double x, int lowest, int highest, HlIf97Pair *power)
{
  power[0] = (HlIf97Pair) { 1.0, 1.0 };
  if (highest >= 1)
    power[1] = (HlIf97Pair) { x, x };
#pragma GCC unroll 64
  for (int k = 2; k <= highest; k++)
    power[k] = power[k / 2] * power[k - k / 2];
  if (lowest <= -1)
    power[-1] = (HlIf97Pair) { 1.0 / x, 1.0 / x };
#pragma GCC unroll 64
  for (int k = 2; k <= -lowest; k++)
    power[-k] = power[-(k / 2)] * power[-(k - k / 2)];
}

/* Sums over n x^I y^J, in pairs, with the factors
 *
 *   one       1            J          jj       J (J - 1)       J (J - 1) (J - 2)
 *   i         I            I J        ijj      I J (J - 1)     I J (J - 1) (J - 2)
 *   ii        I (I - 1)    I (I - 1) J
 *
 * Divided by powers of x and y they are derivatives. */
typedef struct { HlIf97Pair one, i, ii, jj, ijj; } HlIf97Sums;

/* With has_ijj FALSE the sums ijj stay 0. */
HL_IF97_INLINE void
hl_if97_sums (const HlIf97Term *terms, int n, const HlIf97Pair *x, const HlIf97Pair *y, gboolean has_ijj,
              HlIf97Sums *sums)
{
  HlIf97Sums total = { 0 };
  HlIf97Pair low = { 0 }, high = { 0 };
#pragma GCC unroll 64
  for (int k = 0; k < n; k++)
    {
      double c = terms[k].n, J = terms[k].J, I = terms[k].I;
      HlIf97Pair power = y[terms[k].J];
      HlIf97Pair t_low = (HlIf97Pair) { c, c * J } * power;
      HlIf97Pair t_high = (HlIf97Pair) { c * (J * (J - 1.0)), c * (J * (J - 1.0) * (J - 2.0)) } * power;
      gboolean has_high = terms[k].J != 0 && terms[k].J != 1;
      gboolean starts = HL_IF97_GROUP_STARTS (terms, k);
      low = starts ? t_low : low + t_low;
      high = starts ? t_high : has_high ? high + t_high : high;
      if (!HL_IF97_GROUP_ENDS (terms, n, k))
        continue;
      if (terms[k].I != 0)
        {
          low *= x[terms[k].I];
          high *= x[terms[k].I];
          total.i += terms[k].I == 1 ? low : I * low;
          if (has_ijj)
            total.ijj += terms[k].I == 1 ? high : I * high;
        }
      if (terms[k].I != 0 && terms[k].I != 1)
        total.ii += (I * (I - 1.0)) * low;
      total.one += low;
      total.jj += high;
    }
  *sums = total;
}

/* The sums that h and cp, or s and cp, at given x ask for: of 1 (only with
 * has_one), of J and of J (J - 1). */
typedef struct { double one; HlIf97Pair j; } HlIf97SumsJ;

HL_IF97_INLINE void
hl_if97_sums_j (const HlIf97Term *terms, int n, const HlIf97Pair *x, const HlIf97Pair *y, gboolean has_one,
                HlIf97SumsJ *sums)
{
  HlIf97SumsJ total = { 0 };
  HlIf97Pair group = { 0 };
  double one = 0.0;
#pragma GCC unroll 64
  for (int k = 0; k < n; k++)
    {
      double c = terms[k].n, J = terms[k].J;
      HlIf97Pair t = (HlIf97Pair) { c * J, c * (J * (J - 1.0)) } * y[terms[k].J];
      gboolean starts = HL_IF97_GROUP_STARTS (terms, k);
      group = starts ? t : terms[k].J != 0 ? group + t : group;
      if (has_one)
        one = starts ? c * y[terms[k].J][0] : one + c * y[terms[k].J][0];
      if (!HL_IF97_GROUP_ENDS (terms, n, k))
        continue;
      total.j += terms[k].I == 0 ? group : group * x[terms[k].I];
      if (has_one)
        total.one += terms[k].I == 0 ? one : one * x[terms[k].I][0];
    }
  *sums = total;
}

G_END_DECLS
