/* IAPWS-IF97 region 4: the saturation line between 273.15 K and the critical point.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "fluid/if97-private.h"

#include <math.h>

/* IAPWS R7-97(2012), Table 34: coefficients of Eqs. 29 to 31. */
static const double n[11] = {
  0.0, 1.1670521452767e3, -7.2421316703206e5, -1.7073846940092e1, 1.202082470247e4, -3.2325550322333e6,
  1.491510861353e1, -4.8232657361591e3, 4.0511340542057e5, -2.3855557567849e-1, 6.5017534844798e2,
};

/* Eq. 29 is a quadratic form in beta = (p/1 MPa)^(1/4) and theta; Eq. 30
 * solves it for beta, Eq. 31 for theta. */
static double
beta_of_theta (double theta)
{
  double A = (theta + n[1]) * theta + n[2];
  double B = (n[3] * theta + n[4]) * theta + n[5];
  double C = (n[6] * theta + n[7]) * theta + n[8];
  return 2.0 * C / (-B + sqrt (B * B - 4.0 * A * C));
}

/**
 * hl_if97_psat:
 * @T: temperature [K], 273.15 to 647.096
 *
 * Returns: saturation pressure [Pa], IAPWS R7-97(2012), Eq. 30
 */
double
hl_if97_psat (double T)
{
  double beta = beta_of_theta (T + n[9] / (T - n[10]));
  return 1e6 * (beta * beta) * (beta * beta);
}

/**
 * hl_if97_psat_T:
 * @T: temperature [K], 273.15 to 647.096
 * @p_T: (out): slope of the saturation line dp/dT [Pa/K]
 *
 * Returns: saturation pressure [Pa], IAPWS R7-97(2012), Eq. 30
 */
double
hl_if97_psat_T (double T, double *p_T)
{
  double per_T_n10 = 1.0 / (T - n[10]);
  double theta = T + n[9] * per_T_n10, theta_T = 1.0 - n[9] * per_T_n10 * per_T_n10;
  double b = beta_of_theta (theta), b2 = b * b;
  /* Slope of beta from the quadratic form, as for any implicit function. */
  double form_theta = b2 * (2.0 * theta + n[1]) + b * (2.0 * n[3] * theta + n[4]) + 2.0 * n[6] * theta + n[7];
  double form_beta = 2.0 * b * ((theta + n[1]) * theta + n[2]) + (n[3] * theta + n[4]) * theta + n[5];
  *p_T = -4e6 * b * b2 * form_theta / form_beta * theta_T;
  return 1e6 * b2 * b2;
}

/**
 * hl_if97_Tsat:
 * @p: pressure [Pa], 611.213 to 22.064e6
 *
 * Returns: saturation temperature [K], IAPWS R7-97(2012), Eq. 31
 */
double
hl_if97_Tsat (double p)
{
  double b2 = sqrt (1e-6 * p), b = sqrt (b2);
  double E = b2 + n[3] * b + n[6];
  double F = n[1] * b2 + n[4] * b + n[7];
  double G = n[2] * b2 + n[5] * b + n[8];
  double D = 2.0 * G / (-F - sqrt (F * F - 4.0 * E * G));
  double sum = n[10] + D;
  return 0.5 * (sum - sqrt (sum * sum - 4.0 * (n[9] + n[10] * D)));
}
