/* IAPWS-IF97 region 5: steam from 1073.15 K to 2273.15 K up to 50 MPa.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "fluid/if97-gibbs.h"

/* IAPWS R7-97(2012), Table 37: coefficients and exponents of the ideal-gas part, Eq. 33. */
static const HlIf97Term ideal_terms[] = {
  { 0, 0, -1.3179983674201e1 }, { 0, 1, 6.8540841634434 }, { 0, -3, -2.4805148933466e-2 },
  { 0, -2, 3.6901534980333e-1 }, { 0, -1, -3.1161318213925 }, { 0, 2, -3.2961626538917e-1 },
};

/* IAPWS R7-97(2012), Table 38: coefficients and exponents of the residual part, Eq. 34. */
static const HlIf97Term terms[] = {
  { 1, 1, 1.5736404855259e-3 }, { 1, 2, 9.0153761673944e-4 }, { 1, 3, -5.0270077677648e-3 },
  { 2, 3, 2.2440037409485e-6 }, { 2, 9, -4.1163275453471e-6 }, { 3, 7, 3.7919454822955e-8 },
};

#define P_STAR 1e6      /* [Pa] */
#define T_STAR 1000.0   /* [K] */

HL_IF97_INLINE double
evaluate (double p, double T, HlIf97Given given, double value, double most_left, HlState *state)
{
  HlIf97Pair x[4], powers_t[3 + 10], *t = powers_t + 3;
  double pi = p * (1.0 / P_STAR), ln_pi = log (pi);
  HlIf97Sums sums, ideal;
  hl_if97_pair_powers (pi, NAN, 0, 3, x);
  hl_if97_pair_powers (T_STAR / T, T / T_STAR, -3, 9, t);
  hl_if97_sums (terms, G_N_ELEMENTS (terms), x, t, given != HL_IF97_AT_T, &sums);
  hl_if97_sums (ideal_terms, G_N_ELEMENTS (ideal_terms), NULL, t, FALSE, &ideal);

  HlIf97Gibbs gamma = {
    .one = ln_pi + ideal.one[0] + sums.one[0], .t = ideal.one[1] + sums.one[1],
    .tt = ideal.jj[0] + sums.jj[0], .ttt = ideal.jj[1] + sums.jj[1],
    .p = 1.0 + sums.i[0], .pt = sums.i[1], .ptt = sums.ijj[0], .pp = -1.0 + sums.ii[0], .ppt = sums.ii[1],
  };
  return hl_if97_state_from_gibbs (p, T, &gamma, given, value, most_left, state);
}

HL_IF97_INLINE void
evaluate_calorics (double p, double T, gboolean has_one, double *one, double *t, double *cp)
{
  HlIf97Pair x[4], powers_t[3 + 10], *pt = powers_t + 3;
  double pi = p * (1.0 / P_STAR);
  HlIf97SumsJ sums, ideal;
  hl_if97_pair_powers (pi, NAN, 0, 3, x);
  hl_if97_pair_powers (T_STAR / T, T / T_STAR, -3, 9, pt);
  hl_if97_sums_j (terms, G_N_ELEMENTS (terms), x, pt, has_one, &sums);
  hl_if97_sums_j (ideal_terms, G_N_ELEMENTS (ideal_terms), NULL, pt, has_one, &ideal);
  *one = has_one ? log (pi) + ideal.one + sums.one : 0.0;
  *t = ideal.j[0] + sums.j[0];
  *cp = -HL_IF97_R * (ideal.j[1] + sums.j[1]);
}

/* Hot steam by IAPWS R7-97(2012), Eq. 32.  No range check: the equation is
 * smooth some way beyond its region. */
HL_IF97_DEFINE_REGION (region5)
