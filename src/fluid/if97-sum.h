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

/* The integers 0 to 40, each twice.  They stand in memory of another file, as
 * the compiler would else build each pair anew from a single constant. */
extern const HlIf97Pair hl_if97_integers[41];

/* The same number twice, such that the compiler forgets that both are the
 * same: else it multiplies single numbers and doubles each power again. */
HL_IF97_INLINE HlIf97Pair
hl_if97_pair (double x)
{
  HlIf97Pair pair = { x, x };
#ifdef __x86_64__
  __asm__ ("" : "+x" (pair));
#endif
  return pair;
}

/* As hl_if97_powers(), each power twice; the caller gives 1/x where there are
 * negative powers, as it often has a shorter way to it than by x. */
HL_IF97_INLINE void
hl_if97_pair_powers (double x, double inverse, int lowest, int highest, HlIf97Pair *power)
{
  power[0] = (HlIf97Pair) { 1.0, 1.0 };
  if (highest >= 1)
    power[1] = hl_if97_pair (x);
#pragma GCC unroll 64
  for (int k = 2; k <= highest; k++)
    power[k] = power[k / 2] * power[k - k / 2];
  if (lowest <= -1)
    power[-1] = hl_if97_pair (inverse);
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

/* With has_ijj FALSE the sums ijj stay 0.  Two sets of totals by turns halve
 * the chain of additions that wait for each other. */
HL_IF97_INLINE void
hl_if97_sums (const HlIf97Term *terms, int n, const HlIf97Pair *x, const HlIf97Pair *y, gboolean has_ijj,
              HlIf97Sums *sums)
{
  HlIf97Sums totals[2] = { 0 };
  int which = 0;
  HlIf97Pair low = { 0 }, high = { 0 };
#pragma GCC unroll 64
  for (int k = 0; k < n; k++)
    {
      double c = terms[k].n, J = terms[k].J;
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
          HlIf97Pair low_i = terms[k].I == 1 ? low : hl_if97_integers[terms[k].I] * low;
          totals[which].i += low_i;
          if (terms[k].I != 1)
            totals[which].ii += terms[k].I == 2 ? low_i : hl_if97_integers[terms[k].I - 1] * low_i;
          if (has_ijj)
            totals[which].ijj += terms[k].I == 1 ? high : hl_if97_integers[terms[k].I] * high;
        }
      totals[which].one += low;
      totals[which].jj += high;
      which = 1 - which;
    }
  sums->one = totals[0].one + totals[1].one;
  sums->i = totals[0].i + totals[1].i;
  sums->ii = totals[0].ii + totals[1].ii;
  sums->jj = totals[0].jj + totals[1].jj;
  sums->ijj = totals[0].ijj + totals[1].ijj;
}

/* The sums that h and cp, or s and cp, at given x ask for: of 1 (only with
 * has_one), of J and of J (J - 1). */
typedef struct { double one; HlIf97Pair j; } HlIf97SumsJ;

HL_IF97_INLINE void
hl_if97_sums_j (const HlIf97Term *terms, int n, const HlIf97Pair *x, const HlIf97Pair *y, gboolean has_one,
                HlIf97SumsJ *sums)
{
  HlIf97SumsJ totals[2] = { 0 };
  HlIf97Pair group = { 0 };
  double one = 0.0;
  int which = 0;
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
      totals[which].j += terms[k].I == 0 ? group : group * x[terms[k].I];
      if (has_one)
        totals[which].one += terms[k].I == 0 ? one : one * x[terms[k].I][0];
      which = 1 - which;
    }
  sums->one = totals[0].one + totals[1].one;
  sums->j = totals[0].j + totals[1].j;
}

G_END_DECLS
