/* States by density and temperature for fluids whose equations are in pressure and temperature.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "fluid/fluid-private.h"

#include <math.h>

#define MAX_STEPS 120
#define LN_P_LOWEST -40.0

/* Volume falls along an isotherm as pressure rises, so the pressure has bounds
 * that close in; where a pressure is outside the range, it lies too high. */
static HlStatus
search_pressure (const HlFluid *fluid, double v, double T, double low, double high, HlState *state)
{
  double ln_p = 0.5 * (low + high);
  gboolean has_smaller = FALSE, has_larger = FALSE;
  HlState here;
  for (int i = 0; i < MAX_STEPS; i++)
    {
      HlStatus status = fluid->state_pT (fluid, exp (ln_p), T, &here);
      double next = NAN;
      if (status == HL_NOT_CONVERGED)
        return status;
      if (status == HL_OUTSIDE_RANGE)
        high = ln_p;
      else
        {
          double v_p = here.v_p - here.v_h * here.T_p / here.T_h;      /* at constant T */
          double miss = log (v / here.v);
          if (miss < 0.0)
            {
              low = ln_p;
              has_larger = TRUE;
            }
          else
            {
              high = ln_p;
              has_smaller = TRUE;
            }
          double step = miss * here.v / (v_p * here.p);
          if (fabs (miss) <= 1e-15 || (fabs (miss) < 1e-11 && fabs (step) <= 1e-15 * fmax (1.0, fabs (ln_p))))
            {
              *state = here;
              return HL_OK;
            }
          next = ln_p + step;
        }
      if (high - low <= 4e-16 * fmax (1.0, fabs (high)))
        break;
      ln_p = next > low && next < high ? next : 0.5 * (low + high);
    }
  if (!has_larger || !has_smaller)
    return HL_OUTSIDE_RANGE;
  /* A jump at a border of the formulation, or the last bit. */
  *state = here;
  return HL_OK;
}

HlStatus
hl_density_by_pressure (const HlFluid *fluid, double density, double T, HlState *state)
{
  HlSaturation sat;
  const HlFluidLimits *limits = &fluid->limits;
  double low = LN_P_LOWEST, high = log (limits->p_max) + 1e-12, v = 1.0 / density;
  if (!(density > 0.0 && isfinite (density) && T >= limits->T_min && T <= limits->T_max))
    return HL_OUTSIDE_RANGE;
  if (fluid->saturation_T (fluid, T, &sat) == HL_OK)
    {
      if (v >= sat.v_liquid && v <= sat.v_vapour && sat.v_vapour > sat.v_liquid)
        return fluid->state_Tx (fluid, T, (v - sat.v_liquid) / (sat.v_vapour - sat.v_liquid), state);
      if (v < sat.v_liquid)
        low = log (sat.p);
      else
        high = log (sat.p) - 1e-15 * fabs (log (sat.p));
    }
  return search_pressure (fluid, v, T, low, high, state);
}
