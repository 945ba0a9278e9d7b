/* IAPWS-IF97 region 3: dense fluid around the critical point, an equation in density and temperature.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "fluid/if97-private.h"
#include "fluid/if97-sum.h"

#include <math.h>

/* IAPWS R7-97(2012), Table 30: coefficients and exponents of Eq. 28, the terms after the logarithm. */
static const HlIf97Term terms[] = {
  { 0, 0, -1.5732845290239e1 }, { 0, 1, 2.0944396974307e1 }, { 0, 2, -7.6867707878716 },
  { 0, 7, 2.6185947787954 }, { 0, 10, -2.808078114862 }, { 0, 12, 1.2053369696517 },
  { 0, 23, -8.4566812812502e-3 }, { 1, 2, -1.2654315477714 }, { 1, 6, -1.1524407806681 },
  { 1, 15, 8.8521043984318e-1 }, { 1, 17, -6.4207765181607e-1 }, { 2, 0, 3.8493460186671e-1 },
  { 2, 2, -8.5214708824206e-1 }, { 2, 6, 4.8972281541877 }, { 2, 7, -3.0502617256965 },
  { 2, 22, 3.9420536879154e-2 }, { 2, 26, 1.2558408424308e-1 }, { 3, 0, -2.799932969871e-1 },
  { 3, 2, 1.389979956946 }, { 3, 4, -2.018991502357 }, { 3, 16, -8.2147637173963e-3 },
  { 3, 26, -4.7596035734923e-1 }, { 4, 0, 4.39840744735e-2 }, { 4, 2, -4.4476435428739e-1 },
  { 4, 4, 9.0572070719733e-1 }, { 4, 26, 7.0522450087967e-1 }, { 5, 1, 1.0770512626332e-1 },
  { 5, 3, -3.2913623258954e-1 }, { 5, 26, -5.0871062041158e-1 }, { 6, 0, -2.2175400873096e-2 },
  { 6, 2, 9.4260751665092e-2 }, { 6, 26, 1.6436278447961e-1 }, { 7, 2, -1.3503372241348e-2 },
  { 8, 26, -1.4834345352472e-2 }, { 9, 2, 5.7922953628084e-4 }, { 9, 26, 3.2308904703711e-3 },
  { 10, 0, 8.0964802996215e-5 }, { 10, 1, -1.6557679795037e-4 }, { 11, 26, -4.4923899061815e-5 },
};

/* The same table's first coefficient, of ln(delta). */
#define N_LOGARITHM 1.0658070028513

/**
 * hl_if97_region3_helmholtz:
 * @density: density [kg/m3]
 * @T: temperature [K]
 * @helmholtz: (out): pressure, h, s, cv and the slopes of pressure, by IAPWS R7-97(2012), Eq. 28
 */
void
hl_if97_region3_helmholtz (double density, double T, HlIf97Helmholtz *helmholtz)
{
  HlIf97Pair x[12], y[27];
  double delta = density * (1.0 / HL_IF97_D_CRITICAL), RT = HL_IF97_R * T;
  HlIf97Sums sums;
  hl_if97_pair_powers (delta, NAN, 0, 11, x);
  hl_if97_pair_powers (HL_IF97_T_CRITICAL / T, NAN, 0, 26, y);
  hl_if97_sums (terms, G_N_ELEMENTS (terms), x, y, FALSE, &sums);

  /* Table 31; each derivative stands multiplied by its variables. */
  double phi = N_LOGARITHM * log (delta) + sums.one[0];
  double phi_d = N_LOGARITHM + sums.i[0];
  double phi_dd = -N_LOGARITHM + sums.ii[0];
  helmholtz->p = density * RT * phi_d;
  helmholtz->h = RT * (sums.one[1] + phi_d);
  helmholtz->s = HL_IF97_R * (sums.one[1] - phi);
  helmholtz->cv = -HL_IF97_R * sums.jj[0];
  helmholtz->p_d = RT * (2.0 * phi_d + phi_dd);
  helmholtz->p_T = density * HL_IF97_R * (phi_d - sums.i[1]);
}

/**
 * hl_if97_region3:
 * @density: density [kg/m3]
 * @T: temperature [K]
 * @state: (out): properties by IAPWS R7-97(2012), Eq. 28; phase is not set
 *
 * The derivatives with respect to (p,h) are written so that they stay finite
 * at the critical point, where cp does not.
 */
void
hl_if97_region3 (double density, double T, HlState *state)
{
  HlIf97Helmholtz f;
  hl_if97_region3_helmholtz (density, T, &f);
  double v = 1.0 / density, per_T = 1.0 / T;
  double A = density * density * f.p_d;
  double cp_A = f.cv * A + T * f.p_T * f.p_T;
  double per_cp_A = 1.0 / cp_A;
  state->p = f.p;
  state->T = T;
  state->h = f.h;
  state->s = f.s;
  state->v = v;
  state->u = f.h - f.p * v;
  state->cp = cp_A / A;
  state->cv = f.cv;
  state->w = v * sqrt (cp_A / f.cv);
  state->x = NAN;
  state->T_p = (T * f.p_T - v * A) * per_cp_A;
  state->T_h = A * per_cp_A;
  state->s_p = -v * per_T;
  state->s_h = per_T;
  state->v_p = -(f.cv + f.p_T * v) * per_cp_A;
  state->v_h = f.p_T * per_cp_A;
}
