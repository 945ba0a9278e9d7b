/* Starts of (p,h) and (p,s) below the critical pressure: isobars of liquid and vapour, solved once when first needed.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "fluid/helmholtz-private.h"

#include <math.h>

#define LEVELS 28
#define STEPS 22
#define ZETA_HIGH 0.02          /* the last level; closer to the critical point the saturation line is start enough */

/* Level k is an isobar at a zeta in even steps, from the coldest saturation to
 * ZETA_HIGH; on it step i stands at T_sat + q^2 (T_edge - T_sat), q = i/(STEPS - 1),
 * so that no cell straddles the saturation line and steps are short beside it.
 * Columns: h, s, T, and v of liquid, p v of vapour, which are nearly straight. */
typedef struct {
  double h[LEVELS][STEPS], s[LEVELS][STEPS], T[LEVELS][STEPS], v[LEVELS][STEPS];
} Side;

struct _HlStartGrid {
  gboolean is_complete;
  double   zeta_low, step;
  Side     liquid, vapour;
};

static gboolean
fill_isobar (const HlHelmholtz *eq, double zeta, guint k, Side *side, gboolean is_liquid)
{
  double T_sat = hl_helmholtz_T_of_zeta (eq, zeta), p = exp (hl_helmholtz_table (eq, HL_SAT_LN_P, zeta)), T_edge = is_liquid ? eq->T_min : eq->T_max;
  for (guint i = 0; i < STEPS; i++)
    {
      double q = i / (STEPS - 1.0), T = T_sat + q * q * (T_edge - T_sat), density;
      HlBranch branch = is_liquid ? HL_BRANCH_LIQUID : T < eq->Tc ? HL_BRANCH_VAPOUR : HL_BRANCH_ABOVE;
      HlState state;
      if (hl_helmholtz_density (eq, p, T, branch, &density) != HL_OK)
        return FALSE;
      hl_helmholtz_state (eq, density, T, &state);
      side->h[k][i] = state.h;
      side->s[k][i] = state.s;
      side->T[k][i] = T;
      side->v[k][i] = is_liquid ? state.v : p * state.v;
    }
  return TRUE;
}

/* A medium whose isobars cannot all be solved does without. */
static HlStartGrid *
grid_new (const HlHelmholtz *eq)
{
  HlStartGrid *grid = g_new0 (HlStartGrid, 1);
  grid->zeta_low = hl_helmholtz_zeta_of_T (eq, eq->T_min);
  grid->step = (ZETA_HIGH - grid->zeta_low) / (LEVELS - 1.0);
  if (!(grid->step < 0.0))
    return grid;
  for (guint k = 0; k < LEVELS; k++)
    {
      double zeta = grid->zeta_low + k * grid->step;
      if (!fill_isobar (eq, zeta, k, &grid->liquid, TRUE) || !fill_isobar (eq, zeta, k, &grid->vapour, FALSE))
        return grid;
    }
  grid->is_complete = TRUE;
  return grid;
}

/* Threads that need it at the same time may each solve it; the first one stays. */
static const HlStartGrid *
grid_of (const HlHelmholtz *eq)
{
  HlStartGrid *grid = g_atomic_pointer_get (eq->grid);
  if (grid != NULL)
    return grid;
  grid = grid_new (eq);
  if (g_atomic_pointer_compare_and_exchange (eq->grid, NULL, grid))
    return grid;
  g_free (grid);
  return g_atomic_pointer_get (eq->grid);
}

/* Four weights of Lagrange's cubic at u, nodes at 0 to 3. */
static void
even_weights (double u, double w[4])
{
  double a = u - 1.0, b = u - 2.0, c = u - 3.0;
  w[0] = -a * b * c / 6.0;
  w[1] = u * b * c / 2.0;
  w[2] = -u * a * c / 2.0;
  w[3] = u * a * b / 6.0;
}

static double
across (const double column[LEVELS][STEPS], guint level, guint step, const double w[4])
{
  return w[0] * column[level][step] + w[1] * column[level + 1][step] + w[2] * column[level + 2][step] + w[3] * column[level + 3][step];
}

/**
 * hl_helmholtz_grid_start:
 * @eq: an equation
 * @p: pressure below the critical one [Pa]
 * @zeta: of its saturation
 * @held: what is given beside it
 * @value: its value, outside of the two-phase region
 * @is_liquid: on which side
 * @T: (out): temperature to start from [K]
 * @v: (out): specific volume to start from [m3/kg]
 *
 * Cubic in both directions, typically within 1e-5.  It is a start and decides nothing.
 *
 * Returns: FALSE near the critical point, or where the grid could not be made
 */
gboolean
hl_helmholtz_grid_start (const HlHelmholtz *eq, double p, double zeta, HlHeld held, double value, gboolean is_liquid, double *T, double *v)
{
  const HlStartGrid *grid = grid_of (eq);
  if (!grid->is_complete || !(zeta > ZETA_HIGH))
    return FALSE;
  const Side *side = is_liquid ? &grid->liquid : &grid->vapour;
  const double (*columns)[STEPS] = held == HL_HELD_H ? side->h : side->s;
  double at = (zeta - grid->zeta_low) / grid->step, x[4], w[4], of_T[4], of_v[4], levels[4];
  guint level = (guint) CLAMP (at - 1.0, 0.0, LEVELS - 4.0), low = 0, high = STEPS - 1;
  even_weights (at - level, levels);
  /* Away from the line h and s fall in the liquid and rise in the vapour. */
  while (high - low > 1)
    {
      guint middle = (low + high) / 2;
      gboolean is_before = is_liquid ? across (columns, level, middle, levels) > value : across (columns, level, middle, levels) < value;
      *(is_before ? &low : &high) = middle;
    }
  guint first = low == 0 ? 0 : MIN (low - 1, STEPS - 4);
  for (guint i = 0; i < 4; i++)
    {
      x[i] = across (columns, level, first + i, levels);
      of_T[i] = across (side->T, level, first + i, levels);
      of_v[i] = across (side->v, level, first + i, levels);
    }
  hl_lagrange_weights (x, value, w);
  *T = w[0] * of_T[0] + w[1] * of_T[1] + w[2] * of_T[2] + w[3] * of_T[3];
  *v = (w[0] * of_v[0] + w[1] * of_v[1] + w[2] * of_v[2] + w[3] * of_v[3]) / (is_liquid ? 1.0 : p);
  return *T > 0.0 && *v > 0.0;
}
