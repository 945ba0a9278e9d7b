/* IAPWS-IF97 region 1: liquid water up to 623.15 K and 100 MPa.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "fluid/if97-gibbs.h"

/* IAPWS R7-97(2012), Table 2: coefficients and exponents of Eq. 7. */
static const HlIf97Term terms[] = {
  { 0, -2, 1.4632971213167e-1 }, { 0, -1, -8.4548187169114e-1 }, { 0, 0, -3.756360367204 },
  { 0, 1, 3.3855169168385 }, { 0, 2, -9.5791963387872e-1 }, { 0, 3, 1.5772038513228e-1 },
  { 0, 4, -1.6616417199501e-2 }, { 0, 5, 8.1214629983568e-4 }, { 1, -9, 2.8319080123804e-4 },
  { 1, -7, -6.0706301565874e-4 }, { 1, -1, -1.8990068218419e-2 }, { 1, 0, -3.2529748770505e-2 },
  { 1, 1, -2.1841717175414e-2 }, { 1, 3, -5.283835796993e-5 }, { 2, -3, -4.7184321073267e-4 },
  { 2, 0, -3.0001780793026e-4 }, { 2, 1, 4.7661393906987e-5 }, { 2, 3, -4.4141845330846e-6 },
  { 2, 17, -7.2694996297594e-16 }, { 3, -4, -3.1679644845054e-5 }, { 3, 0, -2.8270797985312e-6 },
  { 3, 6, -8.5205128120103e-10 }, { 4, -5, -2.2425281908e-6 }, { 4, -2, -6.5171222895601e-7 },
  { 4, 10, -1.4341729937924e-13 }, { 5, -8, -4.0516996860117e-7 }, { 8, -11, -1.2734301741641e-9 },
  { 8, -6, -1.7424871230634e-10 }, { 21, -29, -6.8762131295531e-19 }, { 23, -31, 1.4478307828521e-20 },
  { 29, -38, 2.6335781662795e-23 }, { 30, -39, -1.1947622640071e-23 }, { 31, -40, 1.8228094581404e-24 },
  { 32, -41, -9.3537087292458e-26 },
};

#define P_STAR 16.53e6   /* [Pa] */
#define T_STAR 1386.0    /* [K] */

HL_IF97_INLINE double
evaluate (double p, double T, HlIf97Given given, double value, double most_left, HlState *state)
{
  HlIf97Pair x[33], powers_y[41 + 18], *y = powers_y + 41;
  double pi = p * (1.0 / P_STAR), tau = T_STAR / T;
  HlIf97Sums sums;
  hl_if97_pair_powers (7.1 - pi, NAN, 0, 32, x);
  hl_if97_pair_powers (tau - 1.222, T / (T_STAR - 1.222 * T), -41, 17, y);
  hl_if97_sums (terms, G_N_ELEMENTS (terms), x, y, given != HL_IF97_AT_T, &sums);

  double a = -pi / (7.1 - pi), a2 = a * a, b = T_STAR / (T_STAR - 1.222 * T), b2 = b * b;
  HlIf97Gibbs gamma = {
    .one = sums.one[0], .t = b * sums.one[1], .tt = b2 * sums.jj[0], .ttt = b2 * b * sums.jj[1],
    .p = a * sums.i[0], .pt = a * b * sums.i[1], .ptt = a * b2 * sums.ijj[0],
    .pp = a2 * sums.ii[0], .ppt = a2 * b * sums.ii[1],
  };
  return hl_if97_state_from_gibbs (p, T, &gamma, given, value, most_left, state);
}

HL_IF97_INLINE void
evaluate_calorics (double p, double T, gboolean has_one, double *one, double *t, double *cp)
{
  HlIf97Pair x[33], powers_y[41 + 18], *y = powers_y + 41;
  double tau = T_STAR / T;
  HlIf97SumsJ sums;
  hl_if97_pair_powers (7.1 - p * (1.0 / P_STAR), NAN, 0, 32, x);
  hl_if97_pair_powers (tau - 1.222, T / (T_STAR - 1.222 * T), -41, 17, y);
  hl_if97_sums_j (terms, G_N_ELEMENTS (terms), x, y, has_one, &sums);
  double b = T_STAR / (T_STAR - 1.222 * T);
  *one = sums.one;
  *t = b * sums.j[0];
  *cp = -HL_IF97_R * b * b * sums.j[1];
}

/* Liquid by IAPWS R7-97(2012), Eq. 7.  No range check: the equation is smooth
 * some way beyond its region. */
HL_IF97_DEFINE_REGION (region1)
