/* Backward equations of region 1: starting values, good to 25 mK and 15 kPa.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "fluid/if97-private.h"
#include "fluid/if97-sum.h"

/* IAPWS R7-97(2012), Table 6: coefficients and exponents of Eq. 11. */
static const HlIf97Term terms_T_ph_1[] = {
  { 0, 0, -2.3872489924521e2 }, { 0, 1, 4.0421188637945e2 }, { 0, 2, 1.1349746881718e2 },
  { 0, 6, -5.8457616048039 }, { 0, 22, -1.528548241314e-4 }, { 0, 32, -1.0866707695377e-6 },
  { 1, 0, -1.3391744872602e1 }, { 1, 1, 4.3211039183559e1 }, { 1, 2, -5.4010067170506e1 },
  { 1, 3, 3.0535892203916e1 }, { 1, 4, -6.5964749423638 }, { 1, 10, 9.3965400878363e-3 },
  { 1, 32, 1.157364750534e-7 }, { 2, 10, -2.5858641282073e-5 }, { 2, 32, -4.0644363084799e-9 },
  { 3, 10, 6.6456186191635e-8 }, { 3, 32, 8.0670734103027e-11 }, { 4, 32, -9.3477771213947e-13 },
  { 5, 32, 5.8265442020601e-15 }, { 6, 32, -1.5020185953503e-17 },
};

/**
 * hl_if97_T_ph_1:
 * @p: pressure [Pa]
 * @h: specific enthalpy [J/kg]
 *
 * Returns: temperature [K], IAPWS R7-97(2012), Eq. 11
 */
double
hl_if97_T_ph_1 (double p, double h)
{
  double x[7];
  double y[33];
  hl_if97_powers (p * (1.0 / 1e6), 0, 6, x);
  hl_if97_powers (h * (1.0 / 2.5e6) + 1.0, 0, 32, y);
  return hl_if97_sum (terms_T_ph_1, G_N_ELEMENTS (terms_T_ph_1), x, y);
}

/* IAPWS R7-97(2012), Table 8: coefficients and exponents of Eq. 13. */
static const HlIf97Term terms_T_ps_1[] = {
  { 0, 0, 1.7478268058307e2 }, { 0, 1, 3.4806930892873e1 }, { 0, 2, 6.5292584978455 },
  { 0, 3, 3.3039981775489e-1 }, { 0, 11, -1.9281382923196e-7 }, { 0, 31, -2.4909197244573e-23 },
  { 1, 0, -2.6107636489332e-1 }, { 1, 1, 2.2592965981586e-1 }, { 1, 2, -6.4256463395226e-2 },
  { 1, 3, 7.8876289270526e-3 }, { 1, 12, 3.5672110607366e-10 }, { 1, 31, 1.7332496994895e-24 },
  { 2, 0, 5.6608900654837e-4 }, { 2, 1, -3.2635483139717e-4 }, { 2, 2, 4.4778286690632e-5 },
  { 2, 9, -5.1322156908507e-10 }, { 2, 31, -4.2522657042207e-26 }, { 3, 10, 2.6400441360689e-13 },
  { 3, 32, 7.8124600459723e-29 }, { 4, 32, -3.0732199903668e-31 },
};

/**
 * hl_if97_T_ps_1:
 * @p: pressure [Pa]
 * @s: specific entropy [J/(kg K)]
 *
 * Returns: temperature [K], IAPWS R7-97(2012), Eq. 13
 */
double
hl_if97_T_ps_1 (double p, double s)
{
  double x[5];
  double y[33];
  hl_if97_powers (p * (1.0 / 1e6), 0, 4, x);
  hl_if97_powers (s * (1.0 / 1e3) + 2.0, 0, 32, y);
  return hl_if97_sum (terms_T_ps_1, G_N_ELEMENTS (terms_T_ps_1), x, y);
}

/* IAPWS SR2-01(2014), Table 2: coefficients and exponents of Eq. 1. */
static const HlIf97Term terms_p_hs_1[] = {
  { 0, 0, -6.91997014660582e-1 }, { 0, 1, -1.8361254878756e1 }, { 0, 2, -9.28332409297335 },
  { 0, 4, 6.59639569909906e1 }, { 0, 5, -1.62060388912024e1 }, { 0, 6, 4.50620017338667e2 },
  { 0, 8, 8.5468067822417e2 }, { 0, 14, 6.07523214001162e3 }, { 1, 0, 3.26487682621856e1 },
  { 1, 1, -2.69408844582931e1 }, { 1, 4, -3.199478483343e2 }, { 1, 6, -9.2835430704332e2 },
  { 2, 0, 3.03634537455249e1 }, { 2, 1, -6.50540422444146e1 }, { 2, 10, -4.3099131651613e3 },
  { 3, 4, -7.47512324096068e2 }, { 4, 1, 7.30000345529245e2 }, { 4, 4, 1.14284032569021e3 },
  { 5, 0, -4.36407041874559e2 },
};

/**
 * hl_if97_p_hs_1:
 * @h: specific enthalpy [J/kg]
 * @s: specific entropy [J/(kg K)]
 *
 * Returns: pressure [Pa], IAPWS SR2-01(2014), Eq. 1
 */
double
hl_if97_p_hs_1 (double h, double s)
{
  double x[6];
  double y[15];
  hl_if97_powers (h * (1.0 / 3.4e6) + 0.05, 0, 5, x);
  hl_if97_powers (s * (1.0 / 7.6e3) + 0.05, 0, 14, y);
  return 100e6 * hl_if97_sum (terms_p_hs_1, G_N_ELEMENTS (terms_p_hs_1), x, y);
}
