/* Thermal conductivity of water and steam without its growth near the critical point, IAPWS R15-11.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "fluid/transport-private.h"

#include <math.h>

double
hl_water_conductivity_background (double density, double T)
{
  /* IAPWS R15-11(2011), Table 1. */
  static const double L0[] = { 2.443221e-3, 1.323095e-2, 6.770357e-3, -3.454586e-3, 4.096266e-4 };
  /* R15-11(2011), Table 2: rows by power of (1/T - 1), columns by power of (density - 1). */
  static const double L1[5][6] = {
    { 1.60397357, -0.646013523, 0.111443906, 0.102997357, -0.0504123634, 0.00609859258 },
    { 2.33771842, -2.78843778, 1.53616167, -0.463045512, 0.0832827019, -0.00719201245 },
    { 2.19650529, -4.54580785, 3.55777244, -1.40944978, 0.275418278, -0.0205938816 },
    { -1.21051378, 1.60812989, -0.621178141, 0.0716373224, 0.0, 0.0 },
    { -2.7203370, 4.57586331, -3.18369245, 1.1168348, -0.19268305, 0.012913842 },
  };
  double Tr = T / 647.096, d = density / 322.0, dilute = 0.0, dense = 0.0;
  for (gsize i = G_N_ELEMENTS (L0); i-- > 0;)
    dilute = dilute / Tr + L0[i];
  for (gsize i = G_N_ELEMENTS (L1); i-- > 0;)
    {
      double row = 0.0;
      for (gsize j = G_N_ELEMENTS (L1[0]); j-- > 0;)
        row = row * (d - 1.0) + L1[i][j];
      dense = dense * (1.0 / Tr - 1.0) + row;
    }
  return 1e-3 * sqrt (Tr) / dilute * exp (d * dense);
}
