/* Viscosity of water and steam, IAPWS R12-08.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "fluid/transport-private.h"

#include <math.h>

/* IAPWS R12-08(2008), section 2: reference constants. */
#define T_REFERENCE 647.096
#define D_REFERENCE 322.0
#define P_REFERENCE 22.064e6

double
hl_water_viscosity_background (double density, double T)
{
  /* R12-08(2008), Table 1. */
  static const double H0[] = { 1.67752, 2.20462, 0.6366564, -0.241605 };
  /* R12-08(2008), Table 2: power of (1/T - 1), power of (density - 1), coefficient. */
  static const struct { int i, j; double H; } H1[] = {
    { 0, 0, 5.20094e-1 },  { 1, 0, 8.50895e-2 },  { 2, 0, -1.08374 },    { 3, 0, -2.89555e-1 }, { 0, 1, 2.22531e-1 },  { 1, 1, 9.99115e-1 },
    { 2, 1, 1.88797 },     { 3, 1, 1.26613 },     { 5, 1, 1.20573e-1 },  { 0, 2, -2.81378e-1 }, { 1, 2, -9.06851e-1 }, { 2, 2, -7.72479e-1 },
    { 3, 2, -4.89837e-1 }, { 4, 2, -2.57040e-1 }, { 0, 3, 1.61913e-1 },  { 1, 3, 2.57399e-1 },  { 0, 4, -3.25372e-2 }, { 3, 4, 6.98452e-2 },
    { 4, 5, 8.72102e-3 },  { 3, 6, -4.35673e-3 }, { 5, 6, -5.93264e-4 },
  };
  double Tr = T / T_REFERENCE, d = density / D_REFERENCE;
  double dilute = 0.0, dense = 0.0, a[6] = { 1.0 }, b[7] = { 1.0 };
  for (int i = 1; i < 6; i++)
    a[i] = a[i - 1] * (1.0 / Tr - 1.0);
  for (int j = 1; j < 7; j++)
    b[j] = b[j - 1] * (d - 1.0);
  for (gsize i = G_N_ELEMENTS (H0); i-- > 0;)
    dilute = dilute / Tr + H0[i];
  for (gsize k = 0; k < G_N_ELEMENTS (H1); k++)
    dense += H1[k].H * a[H1[k].i] * b[H1[k].j];
  return 1e-6 * 100.0 * sqrt (Tr) / dilute * exp (d * dense);
}

/* R12-08(2008), Eqs. 20 and 21, with the constants of Table 3. */
double
hl_water_correlation_length (const HlState *state, double d_p_reference)
{
  double d = 1.0 / (state->v * D_REFERENCE), Tr = state->T / T_REFERENCE;
  /* d(density)/dp at constant T; without bound at the critical point. */
  double v_p = state->v_p - state->v_h * state->T_p / state->T_h;
  double d_p = -v_p / (state->v * state->v);
  if (!(d_p >= 0.0 && d_p < 1e13 * D_REFERENCE / P_REFERENCE))
    d_p = 1e13 * D_REFERENCE / P_REFERENCE;
  double excess = d * P_REFERENCE / D_REFERENCE * (d_p - d_p_reference * 1.5 / Tr);
  return excess > 0.0 ? 0.13 * pow (excess / 0.06, 0.630 / 1.239) : 0.0;
}

/* R12-08(2008), Eqs. 14 to 19. */
double
hl_water_viscosity_growth (double correlation_length)
{
  double c = correlation_length / 1.9, d = correlation_length / 1.1, Y;
  if (correlation_length <= 0.3817016416)
    Y = 0.2 * c * pow (d, 5.0) * (1.0 - c + c * c - 765.0 / 504.0 * d * d);
  else
    {
      double angle = acos (1.0 / sqrt (1.0 + d * d)), cc = c * c;
      double w = sqrt (fabs ((c - 1.0) / (c + 1.0))) * tan (0.5 * angle);
      double L = c > 1.0 ? log ((1.0 + w) / (1.0 - w)) : 2.0 * atan (fabs (w));
      Y = sin (3.0 * angle) / 12.0 - sin (2.0 * angle) / (4.0 * c) + (1.0 - 1.25 * cc) * sin (angle) / cc
          - ((1.0 - 1.5 * cc) * angle - pow (fabs (cc - 1.0), 1.5) * L) / (cc * c);
    }
  return exp (0.068 * Y);
}
