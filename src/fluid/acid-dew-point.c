/* Where sulphuric acid begins to condense out of flue gas.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "fluid/gas-private.h"

#include <math.h>

#define MMHG 133.322368               /* [Pa] */

/**
 * hl_acid_dew_point:
 * @p_water: partial pressure of water vapour [Pa]
 * @p_so3: partial pressure of SO3, all of it bound to water or not [Pa]
 *
 * F. H. Verhoff, J. T. Banchero: Predicting dew points of flue gases. Chem. Eng.
 * Progr. 70 (1974) 71: 1000/T = 2.276 - 0.0294 ln a - 0.0858 ln b + 0.0062 ln a ln b,
 * a and b the partial pressures in mmHg.
 *
 * Returns: [K]; NaN where one of them is missing
 */
double
hl_acid_dew_point (double p_water, double p_so3)
{
  if (!(p_water > 0.0 && p_so3 > 0.0))
    return NAN;
  double a = log (p_water / MMHG), b = log (p_so3 / MMHG);
  return 1000.0 / (2.276 - 0.0294 * a - 0.0858 * b + 0.0062 * a * b);
}

/**
 * hl_gas_acid_dew_point:
 * @gas: a gas
 * @p: pressure [Pa]
 * @so3_share: share of its SO2 that has become SO3, 0 to 1; 0.01 to 0.05 is usual
 *   behind a flame (common practice, no source)
 *
 * Returns: [K]; NaN without sulphur or water
 */
double
hl_gas_acid_dew_point (const HlFluid *gas, double p, double so3_share)
{
  g_return_val_if_fail (hl_gas_is_mixture (gas), NAN);
  const HlGasData *data = hl_gas_data ();
  const double *y = hl_gas_of (gas)->y;
  int so2 = hl_gas_find_species (data, "SO2", 3);
  if (!(p > 0.0 && so3_share >= 0.0 && so3_share <= 1.0))
    return NAN;
  return hl_acid_dew_point (y[data->water] * p, y[so2] * so3_share * p);
}
