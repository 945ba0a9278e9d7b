/* Makes the table of (p,h) of a medium: every node solved on the equation, every cell checked against it.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "fluid/fluid-table-private.h"

#include <math.h>

static double
x_of (const HlTableRegion *grid, guint i)
{
  return grid->x_low + i * grid->x_step;
}

static double
p_of_x (const HlFluidTable *table, guint region, double x)
{
  return table->pc * exp (region == HL_TABLE_ABOVE ? x : -x * x);
}

/* dp/dx */
static double
p_x (guint region, double p, double x)
{
  return region == HL_TABLE_ABOVE ? p : -2.0 * x * p;
}

static void
place (HlFluidTable *table)
{
  const HlHelmholtz *eq = table->eq;
  double p_low = fmax (HL_TABLE_SMALLEST_P * eq->pc, 1.0001 * eq->p_min_sat), p_high = fmin (HL_TABLE_LARGEST_P * eq->pc, eq->p_max);
  for (guint r = 0; r < HL_N_TABLE_REGIONS; r++)
    {
      double low = r == HL_TABLE_ABOVE ? HL_TABLE_ABOVE_LOW : HL_TABLE_X_LOW, high = r == HL_TABLE_ABOVE ? log (p_high / eq->pc) : sqrt (log (eq->pc / p_low));
      table->data.regions[r].x_low = low;
      table->data.regions[r].x_step = (high - low) / (HL_TABLE_NX - 1.0);
    }
  hl_table_prepare (table);
}

/* A line of nodes: the ends of the dome with slopes over a step of x. */
static gboolean
fill_line (HlFluidTable *table, guint i)
{
  const HlTableRegion *grid = &table->data.regions[HL_TABLE_LIQUID];
  HlTableLine *line = &table->data.line[i];
  HlSaturation sat;
  double x = x_of (grid, i), p = p_of_x (table, HL_TABLE_LIQUID, x), step = grid->x_step * p_x (HL_TABLE_LIQUID, p, x);
  if (hl_fluid_saturation_p (&table->eq->fluid, p, &sat) != HL_OK)
    return FALSE;
  line->T = (HlTableEdge) { sat.T, sat.T_p * step };
  line->h[0] = (HlTableEdge) { sat.h_liquid, sat.h_liquid_p * step };
  line->h[1] = (HlTableEdge) { sat.h_vapour, sat.h_vapour_p * step };
  line->s[0] = (HlTableEdge) { sat.s_liquid, sat.s_liquid_p * step };
  line->s[1] = (HlTableEdge) { sat.s_vapour, sat.s_vapour_p * step };
  line->v[0] = (HlTableEdge) { sat.v_liquid, sat.v_liquid_p * step };
  line->v[1] = (HlTableEdge) { p * sat.v_vapour, (sat.v_vapour + p * sat.v_vapour_p) * step };
  return TRUE;
}

/* Enthalpy along an isotherm of the range's edge, with its slope over a step. */
static gboolean
edge_at (const HlFluidTable *table, double p, double T, double p_step, HlTableEdge *edge)
{
  HlState state;
  if (hl_fluid_state_pT (&table->eq->fluid, p, T, &state) != HL_OK)
    return FALSE;
  *edge = (HlTableEdge) { state.h, -state.T_p / state.T_h * p_step };
  return TRUE;
}

static gboolean
fill_edges (HlFluidTable *table, guint region, guint i)
{
  HlTableRegion *grid = &table->data.regions[region];
  const HlHelmholtz *eq = table->eq;
  double x = x_of (grid, i), p = p_of_x (table, region, x), step = grid->x_step * p_x (region, p, x);
  switch (region)
    {
    case HL_TABLE_LIQUID:
      grid->inner[i] = table->data.line[i].h[0];
      return edge_at (table, p, eq->T_min, step, &grid->outer[i]);
    case HL_TABLE_VAPOUR:
      grid->inner[i] = table->data.line[i].h[1];
      return edge_at (table, p, eq->T_max, step, &grid->outer[i]);
    default:
      return edge_at (table, p, eq->T_min, step, &grid->inner[i]) && edge_at (table, p, eq->T_max, step, &grid->outer[i]);
    }
}

/* The state of a node; the ends of a row are those of the edges, on the side of the region. */
static HlStatus
solve_node (const HlFluidTable *table, guint region, double p, guint k, double h, HlState *state)
{
  const HlHelmholtz *eq = table->eq;
  HlSaturation sat;
  if (k > 0 || region == HL_TABLE_ABOVE)
    return hl_fluid_state_ph (&eq->fluid, p, h, state);
  HlStatus status = hl_fluid_saturation_p (&eq->fluid, p, &sat);
  if (status == HL_OK)
    hl_helmholtz_state (eq, 1.0 / (region == HL_TABLE_LIQUID ? sat.v_liquid : sat.v_vapour), sat.T, state);
  return status;
}

/* Slopes over x at constant y and over y at constant x, in steps of the grid. */
static gboolean
fill_row (HlFluidTable *table, guint region, guint i)
{
  HlTableRegion *grid = &table->data.regions[region];
  double x = x_of (grid, i), p = p_of_x (table, region, x), p_step = grid->x_step * p_x (region, p, x);
  for (guint k = 0; k < HL_TABLE_NY; k++)
    {
      double y = k / (HL_TABLE_NY - 1.0), h = grid->inner[i].f + y * (grid->outer[i].f - grid->inner[i].f);
      double h_x = grid->inner[i].x + y * (grid->outer[i].x - grid->inner[i].x), h_y = (grid->outer[i].f - grid->inner[i].f) / (HL_TABLE_NY - 1.0);
      HlTableNodes *node = &grid->nodes[i][k];
      HlState st;
      if (solve_node (table, region, p, k, h, &st) != HL_OK)
        return FALSE;
      node->T = (HlTableNode) { .f = st.T, .x = st.T_p * p_step + st.T_h * h_x, .y = st.T_h * h_y };
      node->s = (HlTableNode) { .f = st.s, .x = st.s_p * p_step + st.s_h * h_x, .y = st.s_h * h_y };
      node->v = (HlTableNode) { .f = st.v, .x = st.v_p * p_step + st.v_h * h_x, .y = st.v_h * h_y };
      if (region == HL_TABLE_VAPOUR)
        node->v = (HlTableNode) { .f = p * st.v, .x = st.v * p_step + p * node->v.x, .y = p * node->v.y };
    }
  return TRUE;
}

/* The mixed slope from the slopes over y along x: central differences, one-sided of second order at the ends. */
static double
along_x (const HlTableRegion *grid, guint i, guint k, gsize offset)
{
#define Y(row) (((const HlTableNode *) ((const char *) &grid->nodes[row][k] + offset))->y)
  if (i == 0)
    return -1.5 * Y (0) + 2.0 * Y (1) - 0.5 * Y (2);
  if (i == HL_TABLE_NX - 1)
    return 1.5 * Y (i) - 2.0 * Y (i - 1) + 0.5 * Y (i - 2);
  if (i == 1 || i == HL_TABLE_NX - 2)
    return 0.5 * (Y (i + 1) - Y (i - 1));
  return (8.0 * (Y (i + 1) - Y (i - 1)) - (Y (i + 2) - Y (i - 2))) / 12.0;
#undef Y
}

static void
fill_mixed (HlTableRegion *grid)
{
  for (guint i = 0; i < HL_TABLE_NX; i++)
    for (guint k = 0; k < HL_TABLE_NY; k++)
      {
        HlTableNodes *node = &grid->nodes[i][k];
        node->T.xy = along_x (grid, i, k, G_STRUCT_OFFSET (HlTableNodes, T));
        node->s.xy = along_x (grid, i, k, G_STRUCT_OFFSET (HlTableNodes, s));
        node->v.xy = along_x (grid, i, k, G_STRUCT_OFFSET (HlTableNodes, v));
      }
}

/* Half of what is promised: between the points that are checked the miss may be larger. */
static gboolean
keeps_promise (const HlFluidTable *table, const HlState *ours, const HlState *equation)
{
  return fabs (ours->T - equation->T) <= 0.5 * HL_TABLE_T_MISS && fabs (ours->s - equation->s) <= 0.5 * HL_TABLE_S_MISS * fmax (fabs (equation->s), table->R)
         && fabs (ours->v - equation->v) <= 0.5 * HL_TABLE_V_MISS * equation->v;
}

/* Three points in each cell: the middle, where a cubic misses most, and two between it and the corners. */
static gboolean
is_cell_good (const HlFluidTable *table, guint region, guint i, guint k)
{
  static const struct { double x, y; } points[] = { { 0.5, 0.5 }, { 0.25, 0.7 }, { 0.8, 0.3 } };
  const HlTableRegion *grid = &table->data.regions[region];
  for (gsize n = 0; n < G_N_ELEMENTS (points); n++)
    {
      double x = grid->x_low + (i + points[n].x) * grid->x_step, p = p_of_x (table, region, x), slope, again, per_p;
      double inner = hl_hermite (grid->inner[i].f, grid->inner[i].x, grid->inner[i + 1].f, grid->inner[i + 1].x, points[n].x, &slope);
      double outer = hl_hermite (grid->outer[i].f, grid->outer[i].x, grid->outer[i + 1].f, grid->outer[i + 1].x, points[n].x, &slope);
      double h = inner + (k + points[n].y) / (HL_TABLE_NY - 1.0) * (outer - inner);
      HlState ours, equation;
      gboolean is_good;
      hl_table_x (table, p, &again, &per_p);
      if (!hl_table_lookup (table, region, p, again, per_p, h, &ours, &is_good) || hl_fluid_state_ph (&table->eq->fluid, p, h, &equation) != HL_OK
          || equation.phase == HL_PHASE_TWO_PHASE || !keeps_promise (table, &ours, &equation))
        return FALSE;
    }
  return TRUE;
}

static gboolean
is_line_good (const HlFluidTable *table, guint i)
{
  const HlTableRegion *grid = &table->data.regions[HL_TABLE_LIQUID];
  for (double u = 0.25; u < 1.0; u += 0.25)
    {
      double p = p_of_x (table, HL_TABLE_LIQUID, grid->x_low + (i + u) * grid->x_step), x, x_p;
      HlSaturation sat;
      gboolean is_good;
      hl_table_x (table, p, &x, &x_p);
      if (hl_fluid_saturation_p (&table->eq->fluid, p, &sat) != HL_OK)
        return FALSE;
      for (double q = 0.01; q < 1.0; q += 0.49)
        {
          HlState ours, equation;
          hl_helmholtz_mix (&sat, q, &equation);
          if (!hl_table_below (table, p, x, x_p, equation.h, &ours, &is_good) || ours.phase != HL_PHASE_TWO_PHASE || !keeps_promise (table, &ours, &equation))
            return FALSE;
        }
    }
  return TRUE;
}

static gboolean
fill_region (HlFluidTable *table, guint region, gint *percent)
{
  HlTableRegion *grid = &table->data.regions[region];
  for (guint i = 0; i < HL_TABLE_NX; i++)
    {
      if (!fill_edges (table, region, i) || !fill_row (table, region, i))
        return FALSE;
      g_atomic_int_set (percent, (gint) (100 * (region * 2 * HL_TABLE_NX + i) / (HL_N_TABLE_REGIONS * 2 * HL_TABLE_NX)));
    }
  fill_mixed (grid);
  for (guint i = 0; i + 1 < HL_TABLE_NX; i++)
    {
      for (guint k = 0; k + 1 < HL_TABLE_NY; k++)
        grid->is_good[i][k] = is_cell_good (table, region, i, k);
      g_atomic_int_set (percent, (gint) (100 * ((region * 2 + 1) * HL_TABLE_NX + i) / (HL_N_TABLE_REGIONS * 2 * HL_TABLE_NX)));
    }
  return TRUE;
}

gboolean
hl_table_build (HlFluidTable *table, gint *percent)
{
  place (table);
  if (!(table->data.regions[HL_TABLE_LIQUID].x_step > 0.0) || !(table->data.regions[HL_TABLE_ABOVE].x_step > 0.0))
    return FALSE;
  for (guint i = 0; i < HL_TABLE_NX; i++)
    if (!fill_line (table, i))
      return FALSE;
  for (guint r = 0; r < HL_N_TABLE_REGIONS; r++)
    if (!fill_region (table, r, percent))
      return FALSE;
  for (guint i = 0; i + 1 < HL_TABLE_NX; i++)
    table->data.is_line_good[i] = is_line_good (table, i);
  return TRUE;
}
