/* States of a Helmholtz fluid by (h,s).
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "fluid/helmholtz-private.h"

#include <math.h>

#define MAX_STEPS 200
#define LARGEST_STEP 2.0        /* in ln p */
#define LN_P_LOWEST -40.0

/* Along an isentrope dh = v dp: h rises with p, in one phase as in the mixture, so
 * the pressure is the only unknown and its root the only one. */
typedef struct {
  double low, high;             /* bounds of ln p */
  gboolean has_low, has_high;   /* whether the bounds are states, or the edge of the range */
} Bounds;

/* Where no state has this entropy at a pressure, T is past an end of the range;
 * along an isentrope T rises with p, so the side says where to go on. */
static gboolean
note_edge (Bounds *bounds, double ln_p, HlSide side)
{
  if (side == HL_SIDE_COLD)
    bounds->low = ln_p;
  else if (side == HL_SIDE_HOT)
    bounds->high = ln_p;
  else
    return FALSE;
  return TRUE;
}

static double
next_pressure (const Bounds *bounds, double ln_p, double miss, const HlState *here)
{
  double next;
  double dp = miss / here->v;
  if (here->phase == HL_PHASE_LIQUID)
    next = here->p + dp > 0.0 ? log (here->p + dp) : ln_p - LARGEST_STEP;
  else
    next = ln_p + dp / here->p;
  next = CLAMP (next, ln_p - LARGEST_STEP, ln_p + LARGEST_STEP);
  if (!(next > bounds->low && next < bounds->high))
    next = 0.5 * (bounds->low + bounds->high);
  return next;
}

/* Closer than this no double tells two enthalpies apart, whatever the pressure. */
static double
rounding_of (const HlHelmholtz *eq, double h)
{
  return 2e-16 * fmax (fabs (h), eq->R * eq->Tc);
}

HlStatus
hl_helmholtz_state_hs (const HlFluid *fluid, double h, double s, HlState *state)
{
  const HlHelmholtz *eq = hl_helmholtz_of (fluid);
  Bounds bounds = { .low = LN_P_LOWEST, .high = log (eq->p_max) };
  double ln_p = log (0.3 * eq->pc), ln_p_max = bounds.high;
  HlState here;
  HlSide side;
  if (!isfinite (h) || !isfinite (s))
    return HL_OUTSIDE_RANGE;
  bounds.high += 1e-12;
  for (int i = 0; i < MAX_STEPS; i++)
    {
      HlStatus status = hl_helmholtz_from_p (eq, fmin (exp (ln_p), eq->p_max), HL_HELD_S, s, &here, &side);
      if (status == HL_OK)
        {
          double miss = h - here.h;
          if (fabs (miss) <= rounding_of (eq, h) || fabs (miss) <= 1e-13 * here.p * here.v)
            {
              here.h = h;
              *state = here;
              return HL_OK;
            }
          if (miss > 0.0)
            bounds.low = ln_p;
          else
            bounds.high = ln_p;
          bounds.has_low = bounds.has_low || miss > 0.0;
          bounds.has_high = bounds.has_high || miss < 0.0;
          /* Even the highest pressure does not reach this enthalpy. */
          if (miss > 0.0 && ln_p >= ln_p_max)
            return HL_OUTSIDE_RANGE;
          double next = next_pressure (&bounds, ln_p, miss, &here);
          if (miss > 0.0 && next < ln_p_max && ln_p_max - next < 1e-3)
            next = ln_p_max;
          if (bounds.high - bounds.low <= 1e-15 * fmax (1.0, fabs (ln_p)))
            {
              if (!bounds.has_low || !bounds.has_high)
                return HL_OUTSIDE_RANGE;
              here.h = h;
              *state = here;
              return HL_OK;
            }
          ln_p = next;
          continue;
        }
      if (status != HL_OUTSIDE_RANGE || !note_edge (&bounds, ln_p, side))
        return status;
      if (bounds.high - bounds.low <= 1e-13)
        return HL_OUTSIDE_RANGE;
      ln_p = 0.5 * (bounds.low + bounds.high);
    }
  return HL_NOT_CONVERGED;
}
