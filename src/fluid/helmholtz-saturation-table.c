/* The saturation line of a Helmholtz equation as cubic pieces: starts for the exact solution, and phases far from the line.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "fluid/helmholtz-private.h"

#include <math.h>

/* Nodes stand in geometric progression up to this zeta and evenly above it. */
#define ZETA_FIRST 3e-4
#define ZETA_EVEN 0.04
#define N_GEOMETRIC 48

double
hl_helmholtz_zeta_of_T (const HlHelmholtz *eq, double T)
{
  return T < eq->Tc ? sqrt (1.0 - T / eq->Tc) : 0.0;
}

double
hl_helmholtz_T_of_zeta (const HlHelmholtz *eq, double zeta)
{
  return eq->Tc * (1.0 - zeta * zeta);
}

/* The piece whose key brackets the value; keys rise or fall along the nodes. */
static guint
find_piece (const double *key, double value, gboolean is_falling)
{
  guint low = 0, high = HL_SAT_NODES - 1;
  while (high - low > 1)
    {
      guint middle = (low + high) / 2;
      if (is_falling ? key[middle] >= value : key[middle] <= value)
        low = middle;
      else
        high = middle;
    }
  return low;
}

/* Cubic through both ends of a piece with their slopes, at u in 0..1. */
static double
on_piece (const HlSaturationTable *sat, HlSatColumn column, guint i, double u, double *slope)
{
  double width = sat->zeta[i + 1] - sat->zeta[i];
  double y0 = sat->y[column][i], y1 = sat->y[column][i + 1];
  double m0 = sat->slope[column][i] * width, m1 = sat->slope[column][i + 1] * width;
  double c2 = 3.0 * (y1 - y0) - 2.0 * m0 - m1, c3 = m0 + m1 - 2.0 * (y1 - y0);
  if (slope != NULL)
    *slope = m0 + u * (2.0 * c2 + u * 3.0 * c3);
  return y0 + u * (m0 + u * (c2 + u * c3));
}

/* ln p and ln d'' stand on the nodes in another form, see the header. */
static gboolean
is_scaled (HlSatColumn column)
{
  return column == HL_SAT_LN_P || column == HL_SAT_LN_D_VAPOUR;
}

static double
critical_ln (const HlHelmholtz *eq, HlSatColumn column)
{
  return log (column == HL_SAT_LN_P ? eq->pc : eq->dc);
}

double
hl_helmholtz_table (const HlHelmholtz *eq, HlSatColumn column, double zeta)
{
  guint i = find_piece (eq->sat.zeta, zeta, FALSE);
  double y = on_piece (&eq->sat, column, i, (zeta - eq->sat.zeta[i]) / (eq->sat.zeta[i + 1] - eq->sat.zeta[i]), NULL);
  return is_scaled (column) ? critical_ln (eq, column) + y / (1.0 - zeta * zeta) : y;
}

double
hl_helmholtz_zeta_of_p (const HlHelmholtz *eq, double p)
{
  const HlSaturationTable *sat = &eq->sat;
  double ln_p = log (p), below = ln_p - critical_ln (eq, HL_SAT_LN_P);
  guint i = find_piece (sat->ln_p, ln_p, TRUE);
  double width = sat->zeta[i + 1] - sat->zeta[i];
  double u = (sat->ln_p[i] - ln_p) / (sat->ln_p[i] - sat->ln_p[i + 1]);
  if (i == 0)
    u = sqrt (fmax (u, 0.0));        /* ln p begins with zero slope at the critical point */
  for (int k = 0; k < 5; k++)
    {
      double slope, zeta = sat->zeta[i] + u * width;
      double miss = on_piece (sat, HL_SAT_LN_P, i, u, &slope) - (1.0 - zeta * zeta) * below;
      slope += 2.0 * zeta * width * below;
      if (!(slope < 0.0))
        break;
      double step = miss / slope;
      u = CLAMP (u - step, 0.0, 1.0);
      if (fabs (step) < 1e-9)
        break;
    }
  return sat->zeta[i] + u * width;
}

static double
density_start (const HlDensityStart *start, double T)
{
  double theta = fmax (1.0 - T / start->T, 0.0), S = 0.0;
  for (guint i = 0; i < start->n_terms; i++)
    S += start->terms[i].n * pow (theta, start->terms[i].t);
  switch (start->form)
    {
    case HL_START_LINEAR: return start->density * (1.0 + S);
    case HL_START_EXP: return start->density * exp (S);
    case HL_START_EXP_TAU: return start->density * exp (S * start->T / T);
    }
  return NAN;
}

static void
place_nodes (HlHelmholtz *eq)
{
  double *zeta = eq->sat.zeta, last = hl_helmholtz_zeta_of_T (eq, eq->T_min);
  zeta[0] = 0.0;
  for (guint i = 1; i <= N_GEOMETRIC; i++)
    zeta[i] = ZETA_FIRST * pow (ZETA_EVEN / ZETA_FIRST, (i - 1.0) / (N_GEOMETRIC - 1.0));
  for (guint i = N_GEOMETRIC + 1; i < HL_SAT_NODES; i++)
    zeta[i] = ZETA_EVEN + (last - ZETA_EVEN) * (i - N_GEOMETRIC) / (HL_SAT_NODES - 1.0 - N_GEOMETRIC);
  zeta[HL_SAT_NODES - 1] = last;
}

static void
set_node (HlHelmholtz *eq, guint i, HlSatColumn column, double value, double per_T)
{
  double zeta = eq->sat.zeta[i], T_zeta = -2.0 * eq->Tc * zeta;
  if (is_scaled (column))
    {
      value -= critical_ln (eq, column);
      eq->sat.y[column][i] = (1.0 - zeta * zeta) * value;
      eq->sat.slope[column][i] = -2.0 * zeta * value + (1.0 - zeta * zeta) * per_T * T_zeta;
    }
  else
    {
      eq->sat.y[column][i] = value;
      eq->sat.slope[column][i] = per_T * T_zeta;
    }
}

/* A solved node with the slopes along the line. */
static void
fill_node (HlHelmholtz *eq, guint i, const HlSaturatedPair *pair)
{
  HlSaturation sat;
  hl_helmholtz_saturation_from_pair (eq, pair, &sat);
  double p_T = 1.0 / sat.T_p;
  eq->sat.ln_p[i] = log (pair->p);
  set_node (eq, i, HL_SAT_LN_P, log (pair->p), p_T / pair->p);
  set_node (eq, i, HL_SAT_LN_D_LIQUID, log (pair->d_liquid), -sat.v_liquid_p * p_T * pair->d_liquid);
  set_node (eq, i, HL_SAT_LN_D_VAPOUR, log (pair->d_vapour), -sat.v_vapour_p * p_T * pair->d_vapour);
  set_node (eq, i, HL_SAT_H_LIQUID, sat.h_liquid, sat.h_liquid_p * p_T);
  set_node (eq, i, HL_SAT_H_VAPOUR, sat.h_vapour, sat.h_vapour_p * p_T);
  set_node (eq, i, HL_SAT_S_LIQUID, sat.s_liquid, sat.s_liquid_p * p_T);
  set_node (eq, i, HL_SAT_S_VAPOUR, sat.s_vapour, sat.s_vapour_p * p_T);
}

/* At the critical point, against zeta, ln p is flat and all else is a parabola up
 * to the next node. */
static void
fill_critical_node (HlHelmholtz *eq)
{
  HlState critical;
  hl_helmholtz_state (eq, eq->dc, eq->Tc, &critical);
  double row[HL_N_SAT] = { 0.0, log (eq->dc), 0.0, critical.h, critical.h, critical.s, critical.s };
  eq->sat.ln_p[0] = log (eq->pc);
  for (guint c = 0; c < HL_N_SAT; c++)
    {
      eq->sat.y[c][0] = row[c];
      eq->sat.slope[c][0] = c == HL_SAT_LN_P ? 0.0 : 2.0 * (eq->sat.y[c][1] - row[c]) / eq->sat.zeta[1] - eq->sat.slope[c][1];
    }
}

/* Starts come from the fluid's own start equations up to 0.95 Tc, where they are
 * good, and above from the nodes below it by straight lines in zeta. */
static gboolean
solve_node (const HlHelmholtz *eq, guint i, const HlSaturatedPair before[2], HlSaturatedPair *pair)
{
  double zeta = eq->sat.zeta[i];
  pair->T = hl_helmholtz_T_of_zeta (eq, zeta);
  if (i == HL_SAT_NODES - 1)
    pair->T = eq->T_min;
  pair->d_liquid = density_start (&eq->start_liquid, pair->T);
  pair->d_vapour = density_start (&eq->start_vapour, pair->T);
  if (zeta * zeta < 0.05 && i + 2 < HL_SAT_NODES)
    {
      double step = (zeta - eq->sat.zeta[i + 1]) / (eq->sat.zeta[i + 2] - eq->sat.zeta[i + 1]);
      pair->d_liquid = before[0].d_liquid + step * (before[1].d_liquid - before[0].d_liquid);
      pair->d_vapour = before[0].d_vapour + step * (before[1].d_vapour - before[0].d_vapour);
    }
  return hl_helmholtz_polish_T (eq, pair, 60);
}

/* Solves all nodes from the coldest up.  FALSE with the temperature where no
 * equilibrium was found. */
gboolean
hl_helmholtz_build_saturation (HlHelmholtz *eq, double *T_failed)
{
  HlSaturatedPair before[2] = { { 0 } }, pair;
  place_nodes (eq);
  for (guint i = HL_SAT_NODES - 1; i > 0; i--)
    {
      if (!solve_node (eq, i, before, &pair))
        {
          *T_failed = pair.T;
          return FALSE;
        }
      fill_node (eq, i, &pair);
      if (i == HL_SAT_NODES - 1)
        eq->p_min_sat = pair.p;
      before[1] = before[0];
      before[0] = pair;
    }
  fill_critical_node (eq);
  return TRUE;
}
