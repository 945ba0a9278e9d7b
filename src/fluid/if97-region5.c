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

/**
 * hl_if97_region5:
 * @p: pressure [Pa]
 * @T: temperature [K]
 * @state: (out): properties by IAPWS R7-97(2012), Eq. 32; phase is not set
 *
 * No range check: the equation is smooth some way beyond its region.
 */
void
hl_if97_region5 (double p, double T, HlState *state)
{
  double x[4], powers_t[3 + 10], *t = powers_t + 3;
  double pi = p * (1.0 / P_STAR);
  HlIf97Sums sums;
  HlIf97SumsY ideal;
  hl_if97_powers (pi, 0, 3, x);
  hl_if97_powers (T_STAR / T, -3, 9, t);
  hl_if97_sums (terms, G_N_ELEMENTS (terms), x, t, &sums);
  hl_if97_sums_y (ideal_terms, G_N_ELEMENTS (ideal_terms), x, t, &ideal);

  HlIf97Gibbs gamma = {
    log (pi) + ideal.one + sums.one, 1.0 + sums.i, -1.0 + sums.ii, ideal.j + sums.j, ideal.jj + sums.jj, sums.ij,
  };
  hl_if97_state_from_gibbs (p, T, &gamma, state);
}

/**
 * hl_if97_region5_caloric:
 * @p: pressure [Pa]
 * @T: temperature [K]
 * @caloric: (out): h, s, cp and its slope, by IAPWS R7-97(2012), Eq. 32
 */
void
hl_if97_region5_caloric (double p, double T, HlIf97Caloric *caloric)
{
  double x[4], powers_t[3 + 10], *t = powers_t + 3;
  double pi = p * (1.0 / P_STAR);
  HlIf97SumsY sums, ideal;
  hl_if97_powers (pi, 0, 3, x);
  hl_if97_powers (T_STAR / T, -3, 9, t);
  hl_if97_sums_y (terms, G_N_ELEMENTS (terms), x, t, &sums);
  hl_if97_sums_y (ideal_terms, G_N_ELEMENTS (ideal_terms), x, t, &ideal);

  HlIf97GibbsT gamma = {
    log (pi) + ideal.one + sums.one, ideal.j + sums.j, ideal.jj + sums.jj, ideal.jjj + sums.jjj,
  };
  hl_if97_caloric_from_gibbs (T, &gamma, caloric);
}
