/* Reads states by (p,h) from a table; makes each table once, in a thread of its own.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "fluid/fluid-table-private.h"

#include <math.h>

static GMutex lock;
static GCond changed;
static GHashTable *jobs;               /* HlFluid -> Job, guarded by lock; never freed */

typedef struct {
  const HlFluid *fluid;
  HlFluidTable  *table;                /* complete or NULL */
  HlTableState   state;
  gint           percent;              /* atomic */
} Job;

void
hl_table_x (const HlFluidTable *table, double p, double *x, double *x_p)
{
  double below = table->ln_pc - log (p), per_p = 1.0 / p;
  *x = below > 0.0 ? sqrt (below) : -below;
  *x_p = below > 0.0 ? -0.5 / *x * per_p : per_p;
}

/* Four Hermite weights of a step and their slopes. */
typedef struct { double f0, d0, f1, d1; } Weights;

static inline void
weights_at (double u, Weights *w, Weights *slope)
{
  double uu = u * u;
  w->f1 = uu * (3.0 - 2.0 * u);
  w->f0 = 1.0 - w->f1;
  w->d0 = u * (1.0 - u) * (1.0 - u);
  w->d1 = uu * (u - 1.0);
  slope->f1 = 6.0 * u * (1.0 - u);
  slope->f0 = -slope->f1;
  slope->d0 = 1.0 + u * (3.0 * u - 4.0);
  slope->d1 = u * (3.0 * u - 2.0);
}

/* Both rows of a cell blended along x: value and slope over y at its lower and upper side. */
typedef struct { double f0, d0, f1, d1; } Sides;

static inline Sides
blend (const Weights *x, const HlTableNode *a, const HlTableNode *b, const HlTableNode *c, const HlTableNode *d)
{
  return (Sides) {
    .f0 = x->f0 * a->f + x->d0 * a->x + x->f1 * b->f + x->d1 * b->x, .d0 = x->f0 * a->y + x->d0 * a->xy + x->f1 * b->y + x->d1 * b->xy,
    .f1 = x->f0 * c->f + x->d0 * c->x + x->f1 * d->f + x->d1 * d->x, .d1 = x->f0 * c->y + x->d0 * c->xy + x->f1 * d->y + x->d1 * d->xy,
  };
}

static inline double
along_y (const Weights *y, const Sides *sides)
{
  return y->f0 * sides->f0 + y->d0 * sides->d0 + y->f1 * sides->f1 + y->d1 * sides->d1;
}

/* Which column of cells, and where in it. */
typedef struct { guint i; double u, per_p; } Column;

/* FALSE off the grid. */
static inline gboolean
find_column (const HlFluidTable *table, guint region, double x, double x_p, Column *column)
{
  double per_step = table->per_step[region], at = (x - table->data.regions[region].x_low) * per_step;
  if (!(at >= 0.0 && at <= HL_TABLE_NX - 1.0))
    return FALSE;
  column->i = MIN ((guint) at, HL_TABLE_NX - 2);
  column->u = at - column->i;
  column->per_p = x_p * per_step;
  return TRUE;
}

static inline double
on_edge (const HlTableEdge *a, const HlTableEdge *b, double u, double *slope)
{
  return hl_hermite (a->f, a->x, b->f, b->x, u, slope);
}

/* One phase in a column whose inner edge is known.  FALSE beyond the outer one. */
static inline gboolean
in_column (const HlFluidTable *table, guint region, const Column *column, double inner, double inner_x, double p, double h, HlState *state, gboolean *is_good)
{
  const HlTableRegion *grid = &table->data.regions[region];
  guint i = column->i;
  double ux = column->u, per_p = column->per_p, outer_x, outer = on_edge (&grid->outer[i], &grid->outer[i + 1], ux, &outer_x);
  double per_span = 1.0 / (outer - inner), share = (h - inner) * per_span, y = share * (HL_TABLE_NY - 1.0);
  if (!(share >= 0.0 && share <= 1.0))
    return FALSE;
  guint k = MIN ((guint) y, HL_TABLE_NY - 2);
  Weights wx, wy, sx, sy;
  weights_at (ux, &wx, &sx);
  weights_at (y - k, &wy, &sy);
  const HlTableNodes *a = &grid->nodes[i][k], *b = &grid->nodes[i + 1][k], *c = a + 1, *d = b + 1;
  Sides of_T = blend (&wx, &a->T, &b->T, &c->T, &d->T), of_T_x = blend (&sx, &a->T, &b->T, &c->T, &d->T), of_s = blend (&wx, &a->s, &b->s, &c->s, &d->s);
  Sides of_v = blend (&wx, &a->v, &b->v, &c->v, &d->v), of_v_x = blend (&sx, &a->v, &b->v, &c->v, &d->v);
  double T = along_y (&wy, &of_T), T_y = along_y (&sy, &of_T), T_x = along_y (&wy, &of_T_x), s = along_y (&wy, &of_s);
  double v = along_y (&wy, &of_v), v_y = along_y (&sy, &of_v), v_x = along_y (&wy, &of_v_x);
  double y_h = (HL_TABLE_NY - 1.0) * per_span, per_T = 1.0 / T;
  double y_p = -y_h * (inner_x + share * (outer_x - inner_x)) * per_p;
  double T_p = T_x * per_p + T_y * y_p, T_h = T_y * y_h, v_p = v_x * per_p + v_y * y_p, v_h = v_y * y_h;
  if (region == HL_TABLE_VAPOUR)       /* the grid has p v there */
    {
      double per_pressure = 1.0 / p;
      v *= per_pressure;
      v_p = (v_p - v) * per_pressure;
      v_h *= per_pressure;
    }
  *state = (HlState) {
    .p = p, .T = T, .h = h, .s = s, .v = v, .u = h - p * v, .cp = 1.0 / T_h, .cv = NAN, .w = NAN, .x = NAN,
    .T_p = T_p, .T_h = T_h, .s_p = -v * per_T, .s_h = per_T, .v_p = v_p, .v_h = v_h,
  };
  *is_good = grid->is_good[i][k];
  return TRUE;
}

gboolean
hl_table_lookup (const HlFluidTable *table, guint region, double p, double x, double x_p, double h, HlState *state, gboolean *is_good)
{
  const HlTableRegion *grid = &table->data.regions[region];
  Column column;
  double inner_x;
  if (!find_column (table, region, x, x_p, &column))
    return FALSE;
  double inner = on_edge (&grid->inner[column.i], &grid->inner[column.i + 1], column.u, &inner_x);
  return in_column (table, region, &column, inner, inner_x, p, h, state, is_good);
}

/* Between both ends of the dome, whose enthalpies are known. */
static void
mix (const HlTableLine *a, const Column *column, const double hs[2], const double h_x[2], double p, double h, HlState *state)
{
  const HlTableLine *b = a + 1;
  double T_x, s_x[2], v_x[2], ss[2], vs[2], u = column->u, per_p = column->per_p;
  for (guint k = 0; k < 2; k++)
    {
      ss[k] = on_edge (&a->s[k], &b->s[k], u, &s_x[k]);
      vs[k] = on_edge (&a->v[k], &b->v[k], u, &v_x[k]);
    }
  double T = on_edge (&a->T, &b->T, u, &T_x), per_pressure = 1.0 / p;
  vs[1] *= per_pressure;               /* the line has p v'' */
  HlSaturation sat = {
    .p = p, .T = T, .T_p = T_x * per_p, .h_liquid = hs[0], .h_vapour = hs[1], .s_liquid = ss[0], .s_vapour = ss[1], .v_liquid = vs[0], .v_vapour = vs[1],
    .h_liquid_p = h_x[0] * per_p, .h_vapour_p = h_x[1] * per_p, .s_liquid_p = s_x[0] * per_p, .s_vapour_p = s_x[1] * per_p,
    .v_liquid_p = v_x[0] * per_p, .v_vapour_p = (v_x[1] * per_p - vs[1]) * per_pressure,
  };
  hl_helmholtz_mix (&sat, (h - hs[0]) / (hs[1] - hs[0]), state);
  state->h = h;
}

/* Below the critical pressure: the line divides.  FALSE off the table. */
gboolean
hl_table_below (const HlFluidTable *table, double p, double x, double x_p, double h, HlState *state, gboolean *is_good)
{
  Column column;
  double hs[2], h_x[2];
  if (!find_column (table, HL_TABLE_LIQUID, x, x_p, &column))
    return FALSE;
  const HlTableLine *a = &table->data.line[column.i];
  /* The nearer end first: beyond it the other does not matter. */
  guint side = h > 0.5 * (a->h[0].f + a->h[1].f);
  hs[side] = on_edge (&a->h[side], &a[1].h[side], column.u, &h_x[side]);
  if (side ? h <= hs[1] : h >= hs[0])
    {
      hs[!side] = on_edge (&a->h[!side], &a[1].h[!side], column.u, &h_x[!side]);
      mix (a, &column, hs, h_x, p, h, state);
      *is_good = table->data.is_line_good[column.i];
      return TRUE;
    }
  guint region = side ? HL_TABLE_VAPOUR : HL_TABLE_LIQUID;
  if (!in_column (table, region, &column, hs[side], h_x[side], p, h, state, is_good))
    return FALSE;
  state->phase = side ? HL_PHASE_VAPOUR : HL_PHASE_LIQUID;
  return TRUE;
}

/**
 * hl_fluid_table_state_ph:
 * @table: a table
 * @p: pressure [Pa]
 * @h: specific enthalpy [J/kg]
 * @state: (out): the state, with slopes of the table; untouched on failure
 *
 * Returns: HL_OK; HL_OUTSIDE_RANGE where the table has no good answer and the equation must be asked
 */
HlStatus
hl_fluid_table_state_ph (const HlFluidTable *table, double p, double h, HlState *state)
{
  double x, x_p;
  HlState found;
  gboolean is_good = FALSE;
  if (!(p > 0.0 && isfinite (p) && isfinite (h)))
    return HL_OUTSIDE_RANGE;
  hl_table_x (table, p, &x, &x_p);
  if (p < table->pc)
    {
      if (!hl_table_below (table, p, x, x_p, h, &found, &is_good) || !is_good)
        return HL_OUTSIDE_RANGE;
    }
  else
    {
      if (!hl_table_lookup (table, HL_TABLE_ABOVE, p, x, x_p, h, &found, &is_good) || !is_good)
        return HL_OUTSIDE_RANGE;
      found.phase = found.T > table->Tc ? HL_PHASE_SUPERCRITICAL : HL_PHASE_LIQUID;
    }
  *state = found;
  return HL_OK;
}

/* What follows from the data. */
void
hl_table_prepare (HlFluidTable *table)
{
  for (guint r = 0; r < HL_N_TABLE_REGIONS; r++)
    table->per_step[r] = 1.0 / table->data.regions[r].x_step;
}

/**
 * hl_fluid_table_coverage:
 * @table: a table
 *
 * Returns: share of its cells that keep what the table promises; in the others the equation is asked
 */
double
hl_fluid_table_coverage (const HlFluidTable *table)
{
  guint n_good = 0, n = 0;
  for (guint r = 0; r < HL_N_TABLE_REGIONS; r++)
    for (guint i = 0; i + 1 < HL_TABLE_NX; i++)
      for (guint k = 0; k + 1 < HL_TABLE_NY; k++, n++)
        n_good += table->data.regions[r].is_good[i][k];
  return (double) n_good / n;
}

static HlFluidTable *
table_new (const HlFluid *fluid)
{
  const HlHelmholtz *eq = hl_helmholtz_of (fluid);
  HlFluidTable *table = g_new0 (HlFluidTable, 1);
  table->eq = eq;
  table->R = eq->R;
  table->Tc = eq->Tc;
  table->pc = eq->pc;
  table->ln_pc = log (eq->pc);
  return table;
}

static gpointer
make (gpointer data)
{
  Job *job = data;
  HlFluidTable *table = table_new (job->fluid);
  gboolean is_made = hl_table_load (table);
  if (is_made)
    hl_table_prepare (table);
  if (!is_made && (is_made = hl_table_build (table, &job->percent)))
    hl_table_save (table);
  if (!is_made)
    g_clear_pointer (&table, g_free);
  g_mutex_lock (&lock);
  job->table = table;
  job->state = table != NULL ? HL_TABLE_READY : HL_TABLE_IMPOSSIBLE;
  g_cond_broadcast (&changed);
  g_mutex_unlock (&lock);
  return NULL;
}

/* With the lock held. */
static Job *
job_of (const HlFluid *fluid)
{
  if (jobs == NULL)
    jobs = g_hash_table_new (NULL, NULL);
  Job *job = g_hash_table_lookup (jobs, fluid);
  if (job != NULL)
    return job;
  job = g_new0 (Job, 1);
  job->fluid = fluid;
  g_hash_table_insert (jobs, (gpointer) fluid, job);
  job->state = fluid->state_pT == hl_helmholtz_state_pT ? HL_TABLE_BUILDING : HL_TABLE_IMPOSSIBLE;
  if (job->state == HL_TABLE_BUILDING)
    g_thread_unref (g_thread_new ("table", make, job));
  return job;
}

/**
 * hl_fluid_table:
 * @fluid: a fluid
 *
 * The first call starts the making of it and returns at once.
 *
 * Returns: (nullable): the table; NULL while it is not ready, and for media that have none
 */
const HlFluidTable *
hl_fluid_table (const HlFluid *fluid)
{
  g_mutex_lock (&lock);
  const HlFluidTable *table = job_of (fluid)->table;
  g_mutex_unlock (&lock);
  return table;
}

/**
 * hl_fluid_table_wait:
 * @fluid: a fluid
 *
 * Returns: (nullable): the table, when it is ready; NULL for media that have none
 */
const HlFluidTable *
hl_fluid_table_wait (const HlFluid *fluid)
{
  g_mutex_lock (&lock);
  Job *job = job_of (fluid);
  while (job->state == HL_TABLE_BUILDING)
    g_cond_wait (&changed, &lock);
  const HlFluidTable *table = job->table;
  g_mutex_unlock (&lock);
  return table;
}

/**
 * hl_fluid_table_progress:
 * @fluid: a fluid
 * @share: (out) (optional): 0 to 1
 *
 * Returns: whether it was asked for, is being made, is ready, or cannot be
 */
HlTableState
hl_fluid_table_progress (const HlFluid *fluid, double *share)
{
  g_mutex_lock (&lock);
  const Job *job = jobs != NULL ? g_hash_table_lookup (jobs, fluid) : NULL;
  HlTableState state = job != NULL ? job->state : HL_TABLE_NONE;
  if (share != NULL)
    *share = state == HL_TABLE_READY ? 1.0 : job != NULL ? g_atomic_int_get (&job->percent) / 100.0 : 0.0;
  g_mutex_unlock (&lock);
  return state;
}
