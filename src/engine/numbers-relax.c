/* A block that no start leads into: solved with usual values first, then led to those that were put in.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "engine/numbers-private.h"
#include "engine/equations.h"
#include <cs.h>
#include <math.h>
#include <string.h>

#define FIRST_STEP  0.3        /* of the way from the usual values to those put in: long ones may end at another answer */
#define LEAST_STEP  1e-3
#define MOST_STEPS  80

enum { HOLD_FLOWS, HOLD_STATES, HOLD_USUAL };

typedef struct {
  HlBlockWork *work;
  HlSystem    *system;
  HlNumbers   *numbers;
  const int   *equations, *vars;
  int          n;
  gboolean     keeps_flows;    /* no flow may turn round on the way */
  int         *column_of;      /* [n vars of the system]; -1: not of the block */
  gboolean    *is_odd;         /* [n] equations that hold an unusual value */
  double      *usual;          /* [n] of the block's unknowns; NaN */
  int         *held;           /* [n] unknowns that stand still: 0 free, else the higher the firmer */
  gboolean    *skips;      /* [n] equations to be used last */
  int         *row_of;         /* [n] equation that settles the unknown; -1 */
  int         *column_by;      /* [n] the other way round */
  int         *seen, mark;
} Relax;

/* Looks for a way to let @row settle one more unknown, none held firmer than @firm. */
static gboolean
augment (Relax *r, int row, int firm)
{
  const HlEquation *e = hl_system_equation (r->system, r->equations[row]);
  const int *vars = hl_equation_vars (r->system, e);
  for (int pass = 0; pass < 2; pass++)
    for (int k = 0; k < e->n; k++)
      {
        int c = r->column_of[vars[k]];
        if (c < 0 || r->held[c] > firm || (pass == 0) != (r->row_of[c] < 0) || r->seen[c] == r->mark)
          continue;
        r->seen[c] = r->mark;
        if (pass == 0 || augment (r, r->row_of[c], firm))
          {
            r->row_of[c] = row;
            r->column_by[row] = c;
            return TRUE;
          }
      }
  return FALSE;
}

/* What an equation is good for at first: properties and machines, then sums, then balances of energy. */
static int
rank (const Relax *r, int row)
{
  const HlEquation *e = hl_system_equation (r->system, r->equations[row]);
  return r->skips[row] ? 3 : e->fluid != NULL ? 0 : hl_equation_is_energy (e) ? 2 : 1;
}

/* The one unknown that an equation still lacks; -1: none, or several. */
static int
lacks (const Relax *r, int row)
{
  const HlEquation *e = hl_system_equation (r->system, r->equations[row]);
  const int *vars = hl_equation_vars (r->system, e);
  int at = -1;
  for (int k = 0; k < e->n; k++)
    {
      int c = r->column_of[vars[k]];
      if (c < 0 || c == at || r->held[c] > 0 || r->row_of[c] >= 0)
        continue;
      if (at >= 0)
        return -1;
      at = c;
    }
  return at;
}

/* What can be calculated one after the other shall be: along the flow, as by hand. */
static void
match_one_by_one (Relax *r)
{
  for (gboolean found = TRUE; found;)
    {
      found = FALSE;
      for (int level = 0; level < 3 && !found; level++)
        for (int row = 0; row < r->n && !found; row++)
          {
            int c = r->column_by[row] < 0 && !r->is_odd[row] && rank (r, row) == level ? lacks (r, row) : -1;
            if (c < 0)
              continue;
            r->row_of[c] = row;
            r->column_by[row] = c;
            found = TRUE;
          }
    }
}

/* Equations find unknowns, the odd ones last and only among what nothing else holds. */
static void
match (Relax *r, gboolean may_loosen)
{
  memset (r->seen, 0, sizeof (int) * (gsize) r->n);
  r->mark = 0;
  for (int i = 0; i < r->n; i++)
    r->row_of[i] = r->column_by[i] = -1;
  /* What an equation merely computes, it shall compute. */
  for (int row = 0; row < r->n; row++)
    {
      const HlEquation *e = hl_system_equation (r->system, r->equations[row]);
      int c = e->output >= 0 ? r->column_of[hl_equation_vars (r->system, e)[e->output]] : -1;
      if (c < 0 || r->held[c] > 0 || r->is_odd[row] || r->row_of[c] >= 0)
        continue;
      r->row_of[c] = row;
      r->column_by[row] = c;
    }
  match_one_by_one (r);
  for (int odd = 0; odd < 2; odd++)
    for (int level = 0; level < 4; level++)
      for (int row = 0; row < r->n; row++)
        if (r->column_by[row] < 0 && r->is_odd[row] == odd && rank (r, row) == level)
          for (int firm = 0; firm <= (may_loosen && !odd ? 3 : 0); firm++)
            {
              r->mark++;
              if (augment (r, row, firm))
                break;
            }
}

/* Solves what was matched, part by part; parts that do not work out stay where they are. */
static void
solve_matched (Relax *r, int hold)
{
  int n = 0, n_entries = 0;
  g_autofree int *rows = g_new (int, r->n), *place = g_new (int, r->n), *equations = g_new (int, r->n), *vars = g_new (int, r->n);
  for (int row = 0; row < r->n; row++)
    if (r->column_by[row] >= 0)
      {
        place[r->column_by[row]] = n;
        rows[n++] = row;
        n_entries += hl_system_equation (r->system, r->equations[row])->n;
      }
  if (n == 0)
    return;
  cs *triplets = cs_spalloc (n, n, n_entries, 1, 1);
  for (int i = 0; i < n; i++)
    {
      const HlEquation *e = hl_system_equation (r->system, r->equations[rows[i]]);
      const int *own = hl_equation_vars (r->system, e);
      for (int k = 0; k < e->n; k++)
        {
          int c = r->column_of[own[k]];
          if (c >= 0 && r->row_of[c] >= 0)
            cs_entry (triplets, i, place[c], 1.0);
        }
    }
  cs *pattern = cs_compress (triplets);
  cs_spfree (triplets);
  csd *dm = cs_dmperm (pattern, 0);
  for (int b = dm->nb - 1; b >= 0; b--)
    {
      int size = dm->r[b + 1] - dm->r[b];
      for (int i = 0; i < size; i++)
        {
          equations[i] = r->equations[rows[dm->p[dm->r[b] + i]]];
          vars[i] = r->vars[r->column_by[rows[dm->q[dm->s[b] + i]]]];
        }
      double *x = r->system->x;
      g_autofree double *before = g_new (double, size);
      for (int i = 0; i < size; i++)
        before[i] = x[vars[i]];
      hl_block_keep_flows (r->work, hold == HOLD_USUAL && r->keeps_flows);
      HlFailed failed = size == 1 ? hl_scalar_solve (r->system, equations[0], vars[0], r->numbers)
                                  : hl_block_newton (r->work, equations, vars, size, NULL, r->numbers);
      hl_block_keep_flows (r->work, r->keeps_flows);
      for (int i = 0; i < size && failed == HL_FAILED_NOT; i++)
        if (!hl_numbers_inside (hl_system_var (r->system, vars[i]), x[vars[i]]))
          failed = HL_FAILED_RANGE;
      for (int i = 0; failed != HL_FAILED_NOT && i < size; i++)
        x[vars[i]] = before[i];
      /* Next to states that are only guessed a flow may come out backwards: a little one is the better guess. */
      for (int i = 0; hold == HOLD_STATES && i < size; i++)
        if (hl_system_var (r->system, vars[i])->kind == HL_VAR_FLOW)
          x[vars[i]] = fmax (x[vars[i]], 0.02 * r->system->flow_scale);
    }
  cs_dfree (dm);
  cs_spfree (pattern);
}

static gboolean
is_amount (HlVarKind kind)
{
  return kind == HL_VAR_FLOW || kind == HL_VAR_POWER || kind == HL_VAR_CONDUCTANCE;
}

/* How firmly an unknown stands at its usual value: pressures are let go before differences, these before efficiencies. */
static int
firmness (const Relax *r, int c)
{
  if (isnan (r->usual[c]))
    return 0;
  switch (hl_system_var (r->system, r->vars[c])->kind)
    {
    case HL_VAR_PRESSURE: return 1;
    case HL_VAR_RATIO: return 3;
    default: return 2;
    }
}

static void
go_round (Relax *r, int hold)
{
  for (int c = 0; c < r->n; c++)
    {
      HlVarKind kind = hl_system_var (r->system, r->vars[c])->kind;
      gboolean holds = hold == HOLD_FLOWS ? kind == HL_VAR_FLOW : hold == HOLD_STATES && !is_amount (kind);
      r->held[c] = holds ? 4 : firmness (r, c);
      if (isfinite (r->usual[c]))
        r->system->x[r->vars[c]] = r->usual[c];
    }
  match (r, hold == HOLD_USUAL);
  solve_matched (r, hold);
  /* What has settled a state, as a mixture's, is not to settle a flow as well. */
  for (int row = 0; row < r->n; row++)
    r->skips[row] = hold == HOLD_FLOWS && r->column_by[row] >= 0;
}

/* From an answer to most of the equations to all of them: what is still wrong fades out. */
static HlFailed
lead (Relax *r)
{
  int n = r->n, *vars = (int *) r->vars;
  double *x = r->system->x, done = 0.0, step = FIRST_STEP, value, dr[HL_EQUATION_MOST];
  g_autofree double *wrong = g_new0 (double, n), *offset = g_new0 (double, n), *last = g_new (double, n);
  HlFailed failed = HL_FAILED_STEPS;
  for (int i = 0; i < n; i++)
    {
      last[i] = x[vars[i]];
      if (hl_system_evaluate (r->system, r->equations[i], &value, dr) != HL_OK)
        return HL_FAILED_RANGE;
      wrong[i] = value / hl_system_scale (r->system, hl_system_equation (r->system, r->equations[i])->kind);
    }
  for (int k = 0; k < MOST_STEPS && step >= LEAST_STEP; k++)
    {
      double to = fmin (done + step, 1.0);
      for (int i = 0; i < n; i++)
        offset[i] = -(1.0 - to) * wrong[i];
      failed = hl_block_newton (r->work, r->equations, r->vars, n, offset, r->numbers);
      if (failed == HL_FAILED_NOT && to >= 1.0)
        return HL_FAILED_NOT;
      if (failed == HL_FAILED_NOT)
        {
          for (int i = 0; i < n; i++)
            last[i] = x[vars[i]];
          done = to;
          step = 1.5 * step;
          continue;
        }
      for (int i = 0; i < n; i++)
        x[vars[i]] = last[i];
      step = 0.35 * step;
    }
  return failed == HL_FAILED_NOT ? HL_FAILED_STEPS : failed;
}

/* A number from -1 to 1 that hangs on what the unknown is called, not on its place: plants drawn in another order start alike. */
static double
swing (const HlVar *var, int variant)
{
  guint hash = g_str_hash (var->address.key) * 31 + g_str_hash (var->address.id != NULL ? var->address.id : "");
  hash = (hash ^ hash >> 15) * 2246822519u + (guint) variant * 3266489917u;
  hash = (hash ^ hash >> 13) * 668265263u;
  return (double) (hash >> 8) / (double) (1u << 23) - 1.0;
}

static double
vary (const HlVar *var, double x, int variant)
{
  double by = swing (var, variant);
  switch (var->kind)
    {
    case HL_VAR_PRESSURE: return x + 0.3 * by;
    case HL_VAR_FLOW: return x * (1.0 + 0.5 * by);
    case HL_VAR_RATIO: return x * (1.0 + 0.08 * by);
    case HL_VAR_ENTHALPY: return x * (1.0 + 0.1 * by);
    case HL_VAR_TEMPERATURE_DIFFERENCE: return x * (1.0 + 0.5 * by);
    case HL_VAR_TEMPERATURE: return x * (1.0 + 0.03 * by);
    default: return x;
    }
}

static void
relax_init (Relax *r, const HlUsual *usual)
{
  HlSystem *system = r->system;
  guint n_vars = system->vars->len;
  g_autofree double *values = g_new (double, n_vars + 1);
  g_autofree gboolean *is_unusual = g_new0 (gboolean, n_vars + 1);
  r->column_of = g_new (int, n_vars + 1);
  for (guint v = 0; v <= n_vars; v++)
    {
      values[v] = NAN;
      r->column_of[v] = -1;
    }
  usual->tell (usual->data, r->numbers->is_known, values, is_unusual);
  r->is_odd = g_new0 (gboolean, r->n);
  r->usual = g_new (double, r->n);
  r->held = g_new0 (int, r->n);
  r->skips = g_new0 (gboolean, r->n);
  r->row_of = g_new (int, r->n);
  r->column_by = g_new (int, r->n);
  r->seen = g_new0 (int, r->n);
  for (int c = 0; c < r->n; c++)
    {
      const HlVar *var = hl_system_var (system, r->vars[c]);
      r->column_of[r->vars[c]] = c;
      r->usual[c] = usual->variant > 0 ? vary (var, values[r->vars[c]], usual->variant) : values[r->vars[c]];
      system->x[r->vars[c]] = isfinite (r->usual[c]) ? r->usual[c] : hl_system_start (var, system->flow_scale);
      if (usual->variant > 0 && !isfinite (r->usual[c]))
        system->x[r->vars[c]] = vary (var, system->x[r->vars[c]], usual->variant);
    }
  for (int row = 0; row < r->n; row++)
    {
      const HlEquation *e = hl_system_equation (system, r->equations[row]);
      const int *vars = hl_equation_vars (system, e);
      for (int k = 0; k < e->n; k++)
        r->is_odd[row] |= is_unusual[vars[k]];
    }
}

static void
relax_clear (Relax *r)
{
  g_free (r->column_of);
  g_free (r->is_odd);
  g_free (r->usual);
  g_free (r->held);
  g_free (r->skips);
  g_free (r->row_of);
  g_free (r->column_by);
  g_free (r->seen);
}

HlFailed
hl_block_relax (HlBlockWork *work, const int *equations, const int *vars, int n, const HlUsual *usual, HlNumbers *numbers)
{
  Relax r = { .work = work, .system = hl_block_system (work), .numbers = numbers, .equations = equations, .vars = vars, .n = n, .keeps_flows = usual->first && usual->variant % 2 == 0 };
  relax_init (&r, usual);
  hl_block_set_bold (work, usual->variant % 2 == 1 ? 6 : 0);
  /* States with the flows as they are, then flows with the states as they are: twice, as each changes the other a little. */
  for (int round = 0; round < 2; round++)
    {
      go_round (&r, HOLD_FLOWS);
      go_round (&r, HOLD_STATES);
    }
  go_round (&r, HOLD_USUAL);
  HlFailed failed = lead (&r);
  hl_block_set_bold (work, 0);
  relax_clear (&r);
  return failed;
}
