/* The saturation line of a fluid for pictures: computed once, kept for the life of the program.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "draw/state-diagram-private.h"
#include <math.h>

#define N_DOME 240

static GMutex      domes_lock;
static GHashTable *domes;       /* HlFluid -> HlDome, never freed: fluids live as long as the program */

/* Towards the critical point both branches run flat, T_c - T like the third power of s_c - s: steps in T shrink with the
 * third power too, so that points lie evenly along the line.  The last few hundredths of a kelvin are left to the critical
 * point itself: there the two phases of the equation differ by less than the iteration can tell. */
static HlDome *
dome_new (const HlFluid *fluid)
{
  HlDome *dome = g_new0 (HlDome, 1);
  HlFluidLimits limits;
  HlState critical;
  hl_fluid_limits (fluid, &limits);
  dome->T = g_new (double, N_DOME + 1);
  dome->p = g_new (double, N_DOME + 1);
  dome->h_liquid = g_new (double, N_DOME + 1);
  dome->h_vapour = g_new (double, N_DOME + 1);
  dome->s_liquid = g_new (double, N_DOME + 1);
  dome->s_vapour = g_new (double, N_DOME + 1);
  for (int i = 0; i < N_DOME; i++)
    {
      double u = 1.0 - (double) i / N_DOME, T = limits.T_critical - (limits.T_critical - limits.T_triple) * u * u * u;
      HlSaturation saturation;
      if (limits.T_critical - T < 0.02 || hl_fluid_saturation_T (fluid, T, &saturation) != HL_OK)
        continue;
      dome->T[dome->n] = T;
      dome->s_liquid[dome->n] = saturation.s_liquid;
      dome->s_vapour[dome->n] = saturation.s_vapour;
      dome->p[dome->n] = saturation.p;
      dome->h_liquid[dome->n] = saturation.h_liquid;
      dome->h_vapour[dome->n] = saturation.h_vapour;
      dome->n++;
    }
  if (dome->n == 0)
    return dome;
  dome->T[dome->n] = limits.T_critical;
  dome->p[dome->n] = limits.p_critical;
  dome->s_liquid[dome->n] = (dome->s_liquid[dome->n - 1] + dome->s_vapour[dome->n - 1]) / 2.0;
  dome->h_liquid[dome->n] = (dome->h_liquid[dome->n - 1] + dome->h_vapour[dome->n - 1]) / 2.0;
  if (hl_fluid_state_pT (fluid, limits.p_critical, limits.T_critical, &critical) == HL_OK
      && critical.s > dome->s_liquid[dome->n - 1] && critical.s < dome->s_vapour[dome->n - 1])
    {
      dome->s_liquid[dome->n] = critical.s;
      dome->h_liquid[dome->n] = critical.h;
    }
  dome->s_vapour[dome->n] = dome->s_liquid[dome->n];
  dome->h_vapour[dome->n] = dome->h_liquid[dome->n];
  dome->n++;
  return dome;
}

const HlDome *
hl_dome_of (const HlFluid *fluid)
{
  HlDome *dome;
  g_return_val_if_fail (fluid != NULL, NULL);
  g_mutex_lock (&domes_lock);
  if (domes == NULL)
    domes = g_hash_table_new (NULL, NULL);
  dome = g_hash_table_lookup (domes, fluid);
  if (dome == NULL)
    {
      dome = dome_new (fluid);
      g_hash_table_insert (domes, (gpointer) fluid, dome);
    }
  g_mutex_unlock (&domes_lock);
  return dome;
}

/* The entry below @T, and how far on from it to the next. */
static guint
find_entry (const HlDome *dome, double T, double *share)
{
  guint low = 0, high = dome->n - 1;
  T = CLAMP (T, dome->T[0], dome->T[dome->n - 1]);
  while (high - low > 1)
    {
      guint middle = (low + high) / 2;
      if (dome->T[middle] <= T)
        low = middle;
      else
        high = middle;
    }
  *share = (T - dome->T[low]) / (dome->T[high] - dome->T[low]);
  return low;
}

static double
between (const double *liquid, const double *vapour, guint n, double share, double quality)
{
  double l = liquid[n] + share * (liquid[n + 1] - liquid[n]), v = vapour[n] + share * (vapour[n + 1] - vapour[n]);
  return l + quality * (v - l);
}

double
hl_dome_entropy (const HlDome *dome, double T, double quality)
{
  double share;
  guint n;
  g_return_val_if_fail (dome->n >= 2, NAN);
  n = find_entry (dome, T, &share);
  return between (dome->s_liquid, dome->s_vapour, n, share, quality);
}

HlPoint
hl_dome_point (const HlDome *dome, HlStateDiagramKind kind, double T, double quality)
{
  double share, p;
  guint n;
  g_return_val_if_fail (dome->n >= 2, ((HlPoint) { NAN, NAN }));
  n = find_entry (dome, T, &share);
  /* Vapour pressure runs nearly straight as its logarithm. */
  p = dome->p[n] * pow (dome->p[n + 1] / dome->p[n], share);
  return hl_axes_point (kind, p, CLAMP (T, dome->T[0], dome->T[dome->n - 1]),
                        between (dome->h_liquid, dome->h_vapour, n, share, quality), between (dome->s_liquid, dome->s_vapour, n, share, quality));
}

HlPoint
hl_dome_nth (const HlDome *dome, HlStateDiagramKind kind, guint n, double quality)
{
  return hl_axes_point (kind, dome->p[n], dome->T[n], dome->h_liquid[n] + quality * (dome->h_vapour[n] - dome->h_liquid[n]),
                        dome->s_liquid[n] + quality * (dome->s_vapour[n] - dome->s_liquid[n]));
}
