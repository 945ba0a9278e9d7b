/* Lines between the regions and subregions, as the releases give them.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "fluid/if97-private.h"
#include "fluid/if97-sum.h"

#include <math.h>

/* IAPWS R7-97(2012), Table 1: coefficients n1 to n5 of Eqs. 5 and 6. */
static const double n_B23[5] = { 3.4805185628969e2, -1.1671859879975, 1.0192970039326e-3, 5.7254459862746e2, 1.391883977887e1 };

/* IAPWS R7-97(2012), Table 19: coefficients n1 to n5 of Eqs. 20 and 21. */
static const double n_B2bc[5] = { 9.0584278514723e2, -6.7955786399241e-1, 1.2809002730136e-4, 2.6526571908428e3, 4.5257578905948 };

/* IAPWS SR2-01(2014), Table 5: coefficients of Eq. 2. */
static const double n_B2ab[4] = { -3.49898083432139e3, 2.57560716905876e3, -4.21073558227969e2, 2.76349063799944e1 };

/* IAPWS SR3-03(2014), Table 2: coefficients of Eq. 1. */
static const double n_B3ab[4] = { 2.01464004206875e3, 3.74696550136983, -2.19921901054187e-2, 8.7513168600995e-5 };

/* IAPWS SR3-03(2014), Table 17: coefficients and exponents of Eq. 10. */
static const HlIf97Term terms_psat3_h[] = {
  { 0, 0, 6.00073641753024e-1 }, { 1, 1, -9.36203654849857 }, { 1, 3, 2.46590798594147e1 },
  { 1, 4, -1.07014222858224e2 }, { 1, 36, -9.15821315805768e13 }, { 5, 3, -8.62332011700662e3 },
  { 7, 0, -2.35837344740032e1 }, { 8, 24, 2.52304969384128e17 }, { 14, 16, -3.89718771997719e18 },
  { 20, 16, -3.33775713645296e22 }, { 22, 3, 3.56499469636328e10 }, { 24, 18, -1.48547544720641e26 },
  { 28, 8, 3.30611514838798e18 }, { 36, 24, 8.13641294467829e37 },
};

/**
 * hl_if97_psat3_h:
 * @h: specific enthalpy [J/kg]
 *
 * Returns: saturation pressure where region 3 is saturated at h [Pa], IAPWS SR3-03(2014), Eq. 10
 */
double
hl_if97_psat3_h (double h)
{
  double x[37];
  double y[37];
  hl_if97_powers (h * (1.0 / 2.6e6) - 1.02, 0, 36, x);
  hl_if97_powers (h * (1.0 / 2.6e6) - 0.608, 0, 36, y);
  return 22e6 * hl_if97_sum (terms_psat3_h, G_N_ELEMENTS (terms_psat3_h), x, y);
}

/* IAPWS SR3-03(2014), Table 19: coefficients and exponents of Eq. 11. */
static const HlIf97Term terms_psat3_s[] = {
  { 0, 0, 6.39767553612785e-1 }, { 1, 1, -1.29727445396014e1 }, { 1, 32, -2.24595125848403e15 },
  { 4, 7, 1.77466741801846e6 }, { 12, 4, 7.17079349571538e9 }, { 12, 14, -3.78829107169011e17 },
  { 16, 36, -9.55586736431328e34 }, { 24, 10, 1.87269814676188e23 }, { 28, 0, 1.19254746466473e11 },
  { 32, 18, 1.10649277244882e36 },
};

/**
 * hl_if97_psat3_s:
 * @s: specific entropy [J/(kg K)]
 *
 * Returns: saturation pressure where region 3 is saturated at s [Pa], IAPWS SR3-03(2014), Eq. 11
 */
double
hl_if97_psat3_s (double s)
{
  double x[33];
  double y[37];
  hl_if97_powers (s * (1.0 / 5.2e3) - 1.03, 0, 32, x);
  hl_if97_powers (s * (1.0 / 5.2e3) - 0.699, 0, 36, y);
  return 22e6 * hl_if97_sum (terms_psat3_s, G_N_ELEMENTS (terms_psat3_s), x, y);
}

/* IAPWS SR4-04(2014), Table 9: coefficients and exponents of Eq. 3. */
static const HlIf97Term terms_h_liquid_1[] = {
  { 0, 14, 3.32171191705237e-1 }, { 0, 36, 6.11217706323496e-4 }, { 1, 3, -8.82092478906822 },
  { 1, 16, -4.5562819254325e-1 }, { 2, 0, -2.63483840850452e-5 }, { 2, 5, -2.23949661148062e1 },
  { 3, 4, -4.28398660164013 }, { 3, 36, -6.16679338856916e-1 }, { 4, 4, -1.4682303110404e1 },
  { 4, 16, 2.84523138727299e2 }, { 4, 24, -1.13398503195444e2 }, { 5, 18, 1.15671380760859e3 },
  { 5, 24, 3.95551267359325e2 }, { 7, 1, -1.54891257229285 }, { 8, 4, 1.94486637751291e1 },
  { 12, 2, -3.57915139457043 }, { 12, 4, -3.35369414148819 }, { 14, 1, -6.6442679633246e-1 },
  { 14, 22, 3.23321885383934e4 }, { 16, 10, 3.31766744667084e3 }, { 20, 12, -2.23501257931087e4 },
  { 20, 28, 5.73953875852936e6 }, { 22, 8, 1.73226193407919e2 }, { 24, 3, -3.63968822121321e-2 },
  { 28, 0, 8.34596332878346e-7 }, { 32, 6, 5.03611916682674 }, { 32, 8, 6.55444787064505e1 },
};

/**
 * hl_if97_h_liquid_1:
 * @s: specific entropy [J/(kg K)]
 *
 * Returns: enthalpy of saturated liquid of region 1 [J/kg], IAPWS SR4-04(2014), Eq. 3
 */
double
hl_if97_h_liquid_1 (double s)
{
  double x[33];
  double y[37];
  hl_if97_powers (s * (1.0 / 3.8e3) - 1.09, 0, 32, x);
  hl_if97_powers (s * (1.0 / 3.8e3) + 0.366e-4, 0, 36, y);
  return 1.7e6 * hl_if97_sum (terms_h_liquid_1, G_N_ELEMENTS (terms_h_liquid_1), x, y);
}

/* IAPWS SR4-04(2014), Table 10: coefficients and exponents of Eq. 4. */
static const HlIf97Term terms_h_liquid_3a[] = {
  { 0, 1, 8.22673364673336e-1 }, { 0, 4, 1.81977213534479e-1 }, { 0, 10, -1.12000260313624e-2 },
  { 0, 16, -7.46778287048033e-4 }, { 2, 1, -1.79046263257381e-1 }, { 3, 36, 4.24220110836657e-2 },
  { 4, 3, -3.41355823438768e-1 }, { 4, 16, -2.09881740853565 }, { 5, 20, -8.22477343323596 },
  { 5, 36, -4.99684082076008 }, { 6, 4, 1.91413958471069e-1 }, { 7, 2, 5.81062241093136e-2 },
  { 7, 28, -1.65505498701029e3 }, { 7, 32, 1.58870443421201e3 }, { 10, 14, -8.50623535172818e1 },
  { 10, 32, -3.17714386511207e4 }, { 10, 36, -9.45890406632871e4 }, { 32, 0, -1.3927384708869e-6 },
  { 32, 6, 6.3105253224098e-1 },
};

/**
 * hl_if97_h_liquid_3a:
 * @s: specific entropy [J/(kg K)]
 *
 * Returns: enthalpy of saturated liquid of region 3 [J/kg], IAPWS SR4-04(2014), Eq. 4
 */
double
hl_if97_h_liquid_3a (double s)
{
  double x[33];
  double y[37];
  hl_if97_powers (s * (1.0 / 3.8e3) - 1.09, 0, 32, x);
  hl_if97_powers (s * (1.0 / 3.8e3) + 0.366e-4, 0, 36, y);
  return 1.7e6 * hl_if97_sum (terms_h_liquid_3a, G_N_ELEMENTS (terms_h_liquid_3a), x, y);
}

/* IAPWS SR4-04(2014), Table 16: coefficients and exponents of Eq. 5. */
static const HlIf97Term terms_h_vapour_2ab[] = {
  { 1, 8, -5.24581170928788e2 }, { 1, 24, -9.26947218142218e6 }, { 2, 4, -2.37385107491666e2 },
  { 2, 32, 2.10770155812776e10 }, { 4, 1, -2.39494562010986e1 }, { 4, 2, 2.21802480294197e2 },
  { 7, 7, -5.10472533393438e6 }, { 8, 5, 1.24981396109147e6 }, { 8, 12, 2.00008436996201e9 },
  { 10, 1, -8.15158509791035e2 }, { 12, 0, -1.57612685637523e2 }, { 12, 7, -1.14200422332791e10 },
  { 18, 10, 6.62364680776872e15 }, { 20, 12, -2.27622818296144e18 }, { 24, 32, -1.71048081348406e31 },
  { 28, 8, 6.60788766938091e15 }, { 28, 12, 1.66320055886021e22 }, { 28, 20, -2.18003784381501e29 },
  { 28, 22, -7.87276140295618e29 }, { 28, 24, 1.51062329700346e31 }, { 32, 2, 7.95732170300541e6 },
  { 32, 7, 1.31957647355347e15 }, { 32, 12, -3.2509706829914e23 }, { 32, 14, -4.18600611419248e25 },
  { 32, 24, 2.97478906557467e34 }, { 36, 10, -9.53588761745473e19 }, { 36, 12, 1.66957699620939e24 },
  { 36, 20, -1.75407764869978e32 }, { 36, 22, 3.47581490626396e34 }, { 36, 28, -7.10971318427851e38 },
};

/**
 * hl_if97_h_vapour_2ab:
 * @s: specific entropy [J/(kg K)]
 *
 * Returns: enthalpy of saturated vapour of region 2a, 2b [J/kg], IAPWS SR4-04(2014), Eq. 5
 */
double
hl_if97_h_vapour_2ab (double s)
{
  double x[37];
  double y[33];
  hl_if97_powers (5.21e3 / s - 0.513, 0, 36, x);
  hl_if97_powers (s * (1.0 / 9.2e3) - 0.524, 0, 32, y);
  double sum = hl_if97_sum (terms_h_vapour_2ab, G_N_ELEMENTS (terms_h_vapour_2ab), x, y);
  return 2.8e6 * exp (sum);
}

/* IAPWS SR4-04(2014), Table 17: coefficients and exponents of Eq. 6. */
static const HlIf97Term terms_h_vapour_2c3b[] = {
  { 0, 0, 1.04351280732769 }, { 0, 3, -2.27807912708513 }, { 0, 4, 1.80535256723202 },
  { 1, 0, 4.20440834792042e-1 }, { 1, 12, -1.0572124483466e5 }, { 5, 36, 4.36911607493884e24 },
  { 6, 12, -3.28032702839753e11 }, { 7, 16, -6.7868676080427e15 }, { 8, 2, 7.43957464645363e3 },
  { 8, 20, -3.56896445355761e19 }, { 12, 32, 1.67590585186801e31 }, { 16, 36, -3.55028625419105e37 },
  { 22, 2, 3.96611982166538e11 }, { 22, 32, -4.14716268484468e40 }, { 24, 7, 3.59080103867382e18 },
  { 36, 20, -1.16994334851995e40 },
};

/**
 * hl_if97_h_vapour_2c3b:
 * @s: specific entropy [J/(kg K)]
 *
 * Returns: enthalpy of saturated vapour of regions 2c and 3b [J/kg], IAPWS SR4-04(2014), Eq. 6
 */
double
hl_if97_h_vapour_2c3b (double s)
{
  double x[37];
  double y[37];
  hl_if97_powers (s * (1.0 / 5.9e3) - 1.02, 0, 36, x);
  hl_if97_powers (s * (1.0 / 5.9e3) - 0.726, 0, 36, y);
  double sum = hl_if97_sum (terms_h_vapour_2c3b, G_N_ELEMENTS (terms_h_vapour_2c3b), x, y);
  return 2.8e6 * (sum * sum) * (sum * sum);
}

/* IAPWS SR4-04(2014), Table 23: coefficients and exponents of Eq. 7. */
static const HlIf97Term terms_B13_h[] = {
  { 0, 0, 9.13965547600543e-1 }, { 1, -2, -4.30944856041991e-5 }, { 1, 2, 6.03235694765419e1 },
  { 3, -12, 1.17518273082168e-18 }, { 5, -4, 2.20000904781292e-1 }, { 6, -3, -6.90815545851641e1 },
};

/**
 * hl_if97_B13_h:
 * @s: specific entropy [J/(kg K)]
 *
 * Returns: enthalpy on the boundary between regions 1 and 3 [J/kg], IAPWS SR4-04(2014), Eq. 7
 */
double
hl_if97_B13_h (double s)
{
  double x[7];
  double powers_y[15], *y = powers_y + 12;
  hl_if97_powers (s * (1.0 / 3.8e3) - 0.884, 0, 6, x);
  hl_if97_powers (s * (1.0 / 3.8e3) - 0.864, -12, 2, y);
  return 1.7e6 * hl_if97_sum (terms_B13_h, G_N_ELEMENTS (terms_B13_h), x, y);
}

/**
 * hl_if97_B23_p:
 * @T: temperature [K], 623.15 to 863.15
 *
 * Returns: pressure on the boundary between regions 2 and 3 [Pa], IAPWS R7-97(2012), Eq. 5
 */
double
hl_if97_B23_p (double T)
{
  return 1e6 * (n_B23[0] + (n_B23[1] + n_B23[2] * T) * T);
}

/**
 * hl_if97_B23_T:
 * @p: pressure [Pa], 16.5292e6 to 100e6
 *
 * Returns: temperature on the boundary between regions 2 and 3 [K], IAPWS R7-97(2012), Eq. 6
 */
double
hl_if97_B23_T (double p)
{
  return n_B23[3] + sqrt ((1e-6 * p - n_B23[4]) / n_B23[2]);
}

/**
 * hl_if97_B2bc_p:
 * @h: specific enthalpy [J/kg]
 *
 * Returns: pressure on the boundary between subregions 2b and 2c [Pa], IAPWS R7-97(2012), Eq. 20
 */
double
hl_if97_B2bc_p (double h)
{
  double eta = 1e-3 * h;
  return 1e6 * (n_B2bc[0] + (n_B2bc[1] + n_B2bc[2] * eta) * eta);
}

/**
 * hl_if97_B2bc_h:
 * @p: pressure [Pa], from 6.54670e6
 *
 * Returns: specific enthalpy on the boundary between subregions 2b and 2c [J/kg], IAPWS R7-97(2012), Eq. 21
 */
double
hl_if97_B2bc_h (double p)
{
  return 1e3 * (n_B2bc[3] + sqrt ((1e-6 * p - n_B2bc[4]) / n_B2bc[2]));
}

/**
 * hl_if97_B2ab_h:
 * @s: specific entropy [J/(kg K)]
 *
 * Returns: specific enthalpy on the boundary between subregions 2a and 2b [J/kg], IAPWS SR2-01(2014), Eq. 2
 */
double
hl_if97_B2ab_h (double s)
{
  double sigma = 1e-3 * s;
  return 1e3 * (n_B2ab[0] + (n_B2ab[1] + (n_B2ab[2] + n_B2ab[3] * sigma) * sigma) * sigma);
}

/**
 * hl_if97_B3ab_h:
 * @p: pressure [Pa]
 *
 * Returns: specific enthalpy on the boundary between subregions 3a and 3b [J/kg], IAPWS SR3-03(2014), Eq. 1
 */
double
hl_if97_B3ab_h (double p)
{
  double pi = 1e-6 * p;
  return 1e3 * (n_B3ab[0] + (n_B3ab[1] + (n_B3ab[2] + n_B3ab[3] * pi) * pi) * pi);
}
