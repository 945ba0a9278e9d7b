/* Backward equation v(p,T) of region 3: subregions 3a to 3z, starting values for the density.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "fluid/if97-private.h"
#include "fluid/if97-region3-terms.h"

#include <math.h>

typedef struct {
  const HlIf97Term *terms;
  int    n, I_lowest, I_highest, J_lowest, J_highest;
  double v_star, p_star, T_star;   /* [m3/kg], [Pa], [K] */
  double a, b;
  int    root_x, root_y;           /* 1/c and 1/d: which root of (pi - a) and (theta - b) is raised to I and J */
  int    e;                        /* power of the sum; 0 where the volume is its exponential */
} Subregion;

/* IAPWS SR5-05(2016), Tables 4 and 12: reducing quantities and parameters of Eqs. 4 and 5. */
static const Subregion subregions[26] = {
  { terms_a, G_N_ELEMENTS (terms_a), -12, 2, 0, 12, 0.0024, 1e+08, 760, 0.085, 0.817, 1, 1, 1 },   /* 3a */
  { terms_b, G_N_ELEMENTS (terms_b), -12, 4, 0, 14, 0.0041, 1e+08, 860, 0.28, 0.779, 1, 1, 1 },   /* 3b */
  { terms_c, G_N_ELEMENTS (terms_c), -12, 8, 0, 10, 0.0022, 4e+07, 690, 0.259, 0.903, 1, 1, 1 },   /* 3c */
  { terms_d, G_N_ELEMENTS (terms_d), -12, 3, 0, 16, 0.0029, 4e+07, 690, 0.559, 0.939, 1, 1, 4 },   /* 3d */
  { terms_e, G_N_ELEMENTS (terms_e), -12, 2, 0, 16, 0.0032, 4e+07, 710, 0.587, 0.918, 1, 1, 1 },   /* 3e */
  { terms_f, G_N_ELEMENTS (terms_f), 0, 32, -12, 3, 0.0064, 4e+07, 730, 0.587, 0.891, 2, 1, 4 },   /* 3f */
  { terms_g, G_N_ELEMENTS (terms_g), -12, 10, 0, 24, 0.0027, 2.5e+07, 660, 0.872, 0.971, 1, 1, 4 },   /* 3g */
  { terms_h, G_N_ELEMENTS (terms_h), -12, 1, 0, 16, 0.0032, 2.5e+07, 660, 0.898, 0.983, 1, 1, 4 },   /* 3h */
  { terms_i, G_N_ELEMENTS (terms_i), 0, 36, -12, 12, 0.0041, 2.5e+07, 660, 0.91, 0.984, 2, 1, 4 },   /* 3i */
  { terms_j, G_N_ELEMENTS (terms_j), 0, 28, -12, 3, 0.0054, 2.5e+07, 670, 0.875, 0.964, 2, 1, 4 },   /* 3j */
  { terms_k, G_N_ELEMENTS (terms_k), -2, 12, -12, 14, 0.0077, 2.5e+07, 680, 0.802, 0.935, 1, 1, 1 },   /* 3k */
  { terms_l, G_N_ELEMENTS (terms_l), -12, 14, 0, 36, 0.0026, 2.4e+07, 650, 0.908, 0.989, 1, 1, 4 },   /* 3l */
  { terms_m, G_N_ELEMENTS (terms_m), 0, 28, 0, 36, 0.0028, 2.3e+07, 650, 1, 0.997, 1, 4, 1 },   /* 3m */
  { terms_n, G_N_ELEMENTS (terms_n), 0, 18, -12, 6, 0.0031, 2.3e+07, 650, 0.976, 0.997, 1, 1, 0 },   /* 3n */
  { terms_o, G_N_ELEMENTS (terms_o), 0, 24, -12, 0, 0.0034, 2.3e+07, 650, 0.974, 0.996, 2, 1, 1 },   /* 3o */
  { terms_p, G_N_ELEMENTS (terms_p), 0, 36, -12, 2, 0.0041, 2.3e+07, 650, 0.972, 0.997, 2, 1, 1 },   /* 3p */
  { terms_q, G_N_ELEMENTS (terms_q), -12, 1, 0, 12, 0.0022, 2.3e+07, 650, 0.848, 0.983, 1, 1, 4 },   /* 3q */
  { terms_r, G_N_ELEMENTS (terms_r), -8, 14, -12, 14, 0.0054, 2.3e+07, 650, 0.874, 0.982, 1, 1, 1 },   /* 3r */
  { terms_s, G_N_ELEMENTS (terms_s), -12, 14, 0, 36, 0.0022, 2.1e+07, 640, 0.886, 0.99, 1, 1, 4 },   /* 3s */
  { terms_t, G_N_ELEMENTS (terms_t), 0, 36, 0, 36, 0.0088, 2e+07, 650, 0.803, 1.02, 1, 1, 1 },   /* 3t */
  { terms_u, G_N_ELEMENTS (terms_u), -12, 14, -12, 14, 0.0026, 2.3e+07, 650, 0.902, 0.988, 1, 1, 1 },   /* 3u */
  { terms_v, G_N_ELEMENTS (terms_v), -10, 14, -12, 14, 0.0031, 2.3e+07, 650, 0.96, 0.995, 1, 1, 1 },   /* 3v */
  { terms_w, G_N_ELEMENTS (terms_w), -12, 10, -12, 14, 0.0039, 2.3e+07, 650, 0.959, 0.995, 1, 1, 4 },   /* 3w */
  { terms_x, G_N_ELEMENTS (terms_x), -8, 14, -12, 14, 0.0049, 2.3e+07, 650, 0.91, 0.988, 1, 1, 1 },   /* 3x */
  { terms_y, G_N_ELEMENTS (terms_y), 0, 12, -8, 8, 0.0031, 2.2e+07, 650, 0.996, 0.994, 1, 1, 4 },   /* 3y */
  { terms_z, G_N_ELEMENTS (terms_z), -8, 8, -8, 8, 0.0038, 2.2e+07, 650, 0.993, 0.994, 1, 1, 4 },   /* 3z */
};

/* IAPWS SR5-05(2016), Tables 1 and 9: coefficients of the boundaries, Eqs. 1
 * and 2; with is_logarithm the terms are of ln(pi) to the powers 0, 1, 2, -1, -2. */
static const struct { gboolean is_logarithm; double n[5]; } boundaries[] = {
  [HL_IF97_3AB] = { TRUE, { 1.54793642129415e3, -1.87661219490113e2, 2.13144632222113e1, -1.91887498864292e3, 9.18419702359447e2 } },
  [HL_IF97_3CD] = { FALSE, { 5.85276966696349e2, 2.78233532206915, -1.27283549295878e-2, 1.59090746562729e-4 } },
  [HL_IF97_3GH] = { FALSE, { -2.49284240900418e4, 4.28143584791546e3, -2.6902917314013e2, 7.51608051114157, -7.87105249910383e-2 } },
  [HL_IF97_3IJ] = { FALSE, { 5.84814781649163e2, -6.16179320924617e-1, 2.60763050899562e-1, -5.87071076864459e-3, 5.15308185433082e-5 } },
  [HL_IF97_3JK] = { FALSE, { 6.17229772068439e2, -7.70600270141675, 6.97072596851896e-1, -1.57391839848015e-2, 1.37897492684194e-4 } },
  [HL_IF97_3MN] = { FALSE, { 5.35339483742384e2, 7.61978122720128, -1.58365725441648e-1, 1.92871054508108e-3 } },
  [HL_IF97_3OP] = { TRUE, { 9.69461372400213e2, -3.32500170441278e2, 6.42859598466067e1, 7.73845935768222e2, -1.52313732937084e3 } },
  [HL_IF97_3QU] = { FALSE, { 5.65603648239126e2, 5.29062258221222, -1.02020639611016e-1, 1.22240301070145e-3 } },
  [HL_IF97_3RX] = { FALSE, { 5.84561202520006e2, -1.02961025163669, 2.43293362700452e-1, -2.94905044740799e-3 } },
  [HL_IF97_3UV] = { FALSE, { 5.28199646263062e2, 8.90579602135307, -2.22814134903755e-1, 2.86791682263697e-3 } },
  [HL_IF97_3WX] = { TRUE, { 7.2805260914538, 9.73505869861952e1, 1.47370491183191e1, 3.29196213998375e2, 8.73371668682417e2 } },
};

/**
 * hl_if97_boundary3:
 * @boundary: one of the lines between the subregions of region 3
 * @p: pressure [Pa]
 *
 * Returns: temperature on the line [K], IAPWS SR5-05(2016), Eqs. 1 to 3
 */
double
hl_if97_boundary3 (HlIf97Boundary3 boundary, double p)
{
  double pi = 1e-6 * p;
  /* Eq. 3: a straight line with the saturation line's slope at the critical point. */
  if (boundary == HL_IF97_3EF)
    return 3.727888004 * (pi - 22.064) + HL_IF97_T_CRITICAL;
  const double *n = boundaries[boundary].n;
  if (!boundaries[boundary].is_logarithm)
    return n[0] + (n[1] + (n[2] + (n[3] + n[4] * pi) * pi) * pi) * pi;
  double l = log (pi), per_l = 1.0 / l;
  return n[0] + (n[1] + n[2] * l) * l + (n[3] + n[4] * per_l) * per_l;
}

#define T_AT(line) hl_if97_boundary3 (HL_IF97_3##line, p)

/* Table 10: which auxiliary subregion close to the critical point. */
static char
subregion_near_critical (double p, double T)
{
  if (p > 22.11e6)
    return T <= T_AT (UV) ? 'u' : T <= T_AT (EF) ? 'v' : T <= T_AT (WX) ? 'w' : 'x';
  if (p > HL_IF97_P_CRITICAL)
    return T <= T_AT (UV) ? 'u' : T <= T_AT (EF) ? 'y' : T <= T_AT (WX) ? 'z' : 'x';
  if (T > hl_if97_Tsat (p))
    return p <= 21.90096265e6 ? 'x' : T <= T_AT (WX) ? 'z' : 'x';
  return p <= 21.93161551e6 ? 'u' : T <= T_AT (UV) ? 'u' : 'y';
}

/**
 * hl_if97_subregion3:
 * @p: pressure [Pa]
 * @T: temperature [K]
 *
 * Returns: letter of the subregion of region 3 that holds (p,T), IAPWS SR5-05(2016), Tables 2 and 10
 */
char
hl_if97_subregion3 (double p, double T)
{
  /* Pressures where the saturation line meets the lines 3cd and 643.15 K. */
  const double p_3cd = 19.00881189173929e6, p_643 = 21.04336732e6;
  if (p > 40e6)
    return T <= T_AT (AB) ? 'a' : 'b';
  if (p > 25e6)
    return T <= T_AT (CD) ? 'c' : T <= T_AT (AB) ? 'd' : T <= T_AT (EF) ? 'e' : 'f';
  if (p <= p_3cd)
    return T <= hl_if97_Tsat (p) ? 'c' : 't';
  if (T <= T_AT (CD))
    return 'c';
  if (p <= 20.5e6)
    return T <= hl_if97_Tsat (p) ? 's' : 't';
  if (p <= p_643)
    return T <= hl_if97_Tsat (p) ? 's' : T <= T_AT (JK) ? 'r' : 'k';
  if (p <= 22.5e6)
    return T <= T_AT (QU) ? 'q' : T <= T_AT (RX) ? subregion_near_critical (p, T) : T <= T_AT (JK) ? 'r' : 'k';
  if (T > T_AT (JK))
    return 'k';
  if (T > T_AT (IJ))
    return 'j';
  if (p <= 23e6)
    return T <= T_AT (GH) ? 'l' : T <= T_AT (MN) ? 'm' : T <= T_AT (EF) ? 'n' : T <= T_AT (OP) ? 'o' : 'p';
  if (T > T_AT (EF))
    return 'i';
  if (T > T_AT (GH))
    return 'h';
  return p <= 23.5e6 ? 'l' : 'g';
}

/**
 * hl_if97_v_pT_3:
 * @subregion: letter, 'a' to 'z'
 * @p: pressure [Pa]
 * @T: temperature [K]
 *
 * Returns: specific volume [m3/kg], IAPWS SR5-05(2016), Eqs. 4 and 5
 */
double
hl_if97_v_pT_3 (char subregion, double p, double T)
{
  g_assert (subregion >= 'a' && subregion <= 'z');
  const Subregion *sub = &subregions[subregion - 'a'];
  double powers_x[12 + 37], powers_y[12 + 37], *x = powers_x + 12, *y = powers_y + 12;
  double base_x = p / sub->p_star - sub->a, base_y = T / sub->T_star - sub->b;
  if (sub->root_x == 2)
    base_x = sqrt (base_x);
  if (sub->root_y == 4)
    base_y = sqrt (sqrt (base_y));
  hl_if97_powers (base_x, sub->I_lowest, sub->I_highest, x);
  hl_if97_powers (base_y, sub->J_lowest, sub->J_highest, y);
  double sum = 0.0;
  for (int k = 0; k < sub->n; k++)
    sum += sub->terms[k].n * x[sub->terms[k].I] * y[sub->terms[k].J];
  if (sub->e == 0)
    return sub->v_star * exp (sum);
  return sub->v_star * (sub->e == 4 ? (sum * sum) * (sum * sum) : sum);
}
