/* IAPWS-IF97 region 2: steam up to 1073.15 K, and its metastable continuation below the saturation line.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "fluid/if97-gibbs.h"

/* IAPWS R7-97(2012), Table 10: coefficients and exponents of the ideal-gas part, Eq. 16. */
static const HlIf97Term ideal_terms[] = {
  { 0, 0, -9.6927686500217 }, { 0, 1, 1.0086655968018e1 }, { 0, -5, -5.608791128302e-3 },
  { 0, -4, 7.1452738081455e-2 }, { 0, -3, -4.0710498223928e-1 }, { 0, -2, 1.4240819171444 },
  { 0, -1, -4.383951131945 }, { 0, 2, -2.8408632460772e-1 }, { 0, 3, 2.1268463753307e-2 },
};

/* IAPWS R7-97(2012), Table 11: coefficients and exponents of the residual part, Eq. 17. */
static const HlIf97Term terms[] = {
  { 1, 0, -1.7731742473213e-3 }, { 1, 1, -1.7834862292358e-2 }, { 1, 2, -4.5996013696365e-2 },
  { 1, 3, -5.7581259083432e-2 }, { 1, 6, -5.032527872793e-2 }, { 2, 1, -3.3032641670203e-5 },
  { 2, 2, -1.8948987516315e-4 }, { 2, 4, -3.9392777243355e-3 }, { 2, 7, -4.3797295650573e-2 },
  { 2, 36, -2.6674547914087e-5 }, { 3, 0, 2.0481737692309e-8 }, { 3, 1, 4.3870667284435e-7 },
  { 3, 3, -3.227767723857e-5 }, { 3, 6, -1.5033924542148e-3 }, { 3, 35, -4.0668253562649e-2 },
  { 4, 1, -7.8847309559367e-10 }, { 4, 2, 1.2790717852285e-8 }, { 4, 3, 4.8225372718507e-7 },
  { 5, 7, 2.2922076337661e-6 }, { 6, 3, -1.6714766451061e-11 }, { 6, 16, -2.1171472321355e-3 },
  { 6, 35, -2.3895741934104e1 }, { 7, 0, -5.905956432427e-18 }, { 7, 11, -1.2621808899101e-6 },
  { 7, 25, -3.8946842435739e-2 }, { 8, 8, 1.1256211360459e-11 }, { 8, 36, -8.2311340897998 },
  { 9, 13, 1.9809712802088e-8 }, { 10, 4, 1.0406965210174e-19 }, { 10, 10, -1.0234747095929e-13 },
  { 10, 14, -1.0018179379511e-9 }, { 16, 29, -8.0882908646985e-11 }, { 16, 50, 1.0693031879409e-1 },
  { 18, 57, -3.3662250574171e-1 }, { 20, 20, 8.9185845355421e-25 }, { 20, 35, 3.0629316876232e-13 },
  { 20, 48, -4.2002467698208e-6 }, { 21, 21, -5.9056029685639e-26 }, { 22, 53, 3.7826947613457e-6 },
  { 23, 39, -1.2768608934681e-15 }, { 24, 26, 7.3087610595061e-29 }, { 24, 40, 5.5414715350778e-17 },
  { 24, 58, -9.436970724121e-7 },
};

/* IAPWS R7-97(2012), section 6.2: Table 10 with its first two coefficients
 * exchanged for the metastable-vapour equation (Eq. 18). */
static const HlIf97Term metastable_ideal_terms[] = {
  { 0, 0, -9.6937268393049 }, { 0, 1, 1.0087275970006e1 }, { 0, -5, -5.608791128302e-3 },
  { 0, -4, 7.1452738081455e-2 }, { 0, -3, -4.0710498223928e-1 }, { 0, -2, 1.4240819171444 },
  { 0, -1, -4.383951131945 }, { 0, 2, -2.8408632460772e-1 }, { 0, 3, 2.1268463753307e-2 },
};

/* IAPWS R7-97(2012), Table 16: residual part of the metastable-vapour equation (Eq. 19). */
static const HlIf97Term metastable_terms[] = {
  { 1, 0, -7.3362260186506e-3 }, { 1, 2, -8.8223831943146e-2 }, { 1, 5, -7.2334555213245e-2 },
  { 1, 11, -4.0813178534455e-3 }, { 2, 1, 2.0097803380207e-3 }, { 2, 7, -5.3045921898642e-2 },
  { 2, 16, -7.619040908697e-3 }, { 3, 4, -6.3498037657313e-3 }, { 3, 16, -8.6043093028588e-2 },
  { 4, 7, 7.532158152277e-3 }, { 4, 10, -7.9238375446139e-3 }, { 5, 9, -2.2888160778447e-4 },
  { 5, 10, -2.645650148281e-3 },
};

#define P_STAR 1e6     /* [Pa] */
#define T_STAR 540.0   /* [K] */

/* Sums over the ideal-gas terms: 1 and J, J (J - 1) and J (J - 1) (J - 2). */
HL_IF97_INLINE void
sum_ideal (const HlIf97Term *ideal, double tau, double T, HlIf97Sums *sums)
{
  HlIf97Pair powers_t[5 + 4], *t = powers_t + 5;
  hl_if97_pair_powers (tau, T / T_STAR, -5, 3, t);
  hl_if97_sums (ideal, G_N_ELEMENTS (ideal_terms), NULL, t, FALSE, sums);
}

HL_IF97_INLINE double
evaluate_with (const HlIf97Term *ideal, const HlIf97Term *residual, int n_residual, int highest_x, int highest_y,
               double p, double T, HlIf97Given given, double value, double most_left, HlState *state)
{
  HlIf97Pair x[25], y[59];
  double pi = p * (1.0 / P_STAR), tau = T_STAR / T, ln_pi = log (pi);
  HlIf97Sums sums, sums_ideal;
  hl_if97_pair_powers (pi, NAN, 0, highest_x, x);
  hl_if97_pair_powers (tau - 0.5, NAN, 0, highest_y, y);
  hl_if97_sums (residual, n_residual, x, y, given != HL_IF97_AT_T, &sums);
  sum_ideal (ideal, tau, T, &sums_ideal);

  double b = T_STAR / (T_STAR - 0.5 * T), b2 = b * b;
  HlIf97Gibbs gamma = {
    .one = ln_pi + sums_ideal.one[0] + sums.one[0], .t = sums_ideal.one[1] + b * sums.one[1],
    .tt = sums_ideal.jj[0] + b2 * sums.jj[0], .ttt = sums_ideal.jj[1] + b2 * b * sums.jj[1],
    .p = 1.0 + sums.i[0], .pt = b * sums.i[1], .ptt = b2 * sums.ijj[0],
    .pp = -1.0 + sums.ii[0], .ppt = b * sums.ii[1],
  };
  return hl_if97_state_from_gibbs (p, T, &gamma, given, value, most_left, state);
}

HL_IF97_INLINE double
evaluate (double p, double T, HlIf97Given given, double value, double most_left, HlState *state)
{
  return evaluate_with (ideal_terms, terms, G_N_ELEMENTS (terms), 24, 58, p, T, given, value, most_left, state);
}

HL_IF97_INLINE void
evaluate_calorics (double p, double T, gboolean has_one, double *one, double *t, double *cp)
{
  HlIf97Pair x[25], y[59], powers_t[5 + 4], *pt = powers_t + 5;
  double pi = p * (1.0 / P_STAR), tau = T_STAR / T;
  HlIf97SumsJ sums, ideal;
  hl_if97_pair_powers (pi, NAN, 0, 24, x);
  hl_if97_pair_powers (tau - 0.5, NAN, 0, 58, y);
  hl_if97_pair_powers (tau, T / T_STAR, -5, 3, pt);
  hl_if97_sums_j (terms, G_N_ELEMENTS (terms), x, y, has_one, &sums);
  hl_if97_sums_j (ideal_terms, G_N_ELEMENTS (ideal_terms), NULL, pt, has_one, &ideal);
  double b = T_STAR / (T_STAR - 0.5 * T);
  *one = has_one ? log (pi) + ideal.one + sums.one : 0.0;
  *t = ideal.j[0] + b * sums.j[0];
  *cp = -HL_IF97_R * (ideal.j[1] + b * b * sums.j[1]);
}

/* Steam by IAPWS R7-97(2012), Eq. 15.  No range check: the equation is smooth
 * some way beyond its region. */
HL_IF97_DEFINE_REGION (region2)

/**
 * hl_if97_region2_metastable:
 * @p: pressure [Pa], up to 10 MPa
 * @T: temperature [K]
 * @state: (out): properties of subcooled vapour by IAPWS R7-97(2012), Eq. 18, meant
 *   for the range from the saturated-vapour line to 5 % equilibrium moisture
 */
void
hl_if97_region2_metastable (double p, double T, HlState *state)
{
  evaluate_with (metastable_ideal_terms, metastable_terms, G_N_ELEMENTS (metastable_terms), 5, 16, p, T, HL_IF97_AT_T, 0.0, 0.0, state);
}
