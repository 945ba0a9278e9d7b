/* Random states of water and steam, region by region.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#pragma once
#include "fluid/if97-private.h"

#include <math.h>
G_BEGIN_DECLS

/* Region of (p,T) by IAPWS R7-97(2012), Figure 1, written apart from the
 * dispatch under test; 0 outside. */
static inline int
region_of (double p, double T)
{
  if (T < 273.15 || T > 2273.15 || p > 100e6)
    return 0;
  if (T > 1073.15)
    return p <= 50e6 ? 5 : 0;
  if (T <= 623.15)
    return p >= hl_if97_psat (T) ? 1 : 2;
  return T <= 863.15 && p > hl_if97_B23_p (T) ? 3 : 2;
}

static inline double
random_log (GRand *rand, double low, double high)
{
  return low * exp (g_rand_double (rand) * log (high / low));
}

/* A state of the region: p even in its logarithm or in itself by turns, so
 * that both condenser pressures and the dense regions are met often. */
static inline void
random_state (GRand *rand, int region, double *p, double *T)
{
  double T_low = region == 5 ? 1073.15 : region == 3 ? 623.15 : 273.15;
  double T_high = region == 5 ? 2273.15 : region == 3 ? 863.15 : region == 1 ? 623.15 : 1073.15;
  double p_low = region == 3 ? 16.5e6 : region == 1 ? 620.0 : 1.0, p_high = region == 5 ? 50e6 : 100e6;
  do
    {
      *T = g_rand_double_range (rand, T_low, T_high);
      *p = g_rand_boolean (rand) ? random_log (rand, p_low, p_high) : g_rand_double_range (rand, p_low, p_high);
    }
  while (region_of (*p, *T) != region);
}

G_END_DECLS
