/* What can be solved, in which order, and what is missing or too much: seen from the pattern of the equations alone.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "engine/structure.h"
#include <string.h>
#include <cs.h>

/* --- mass balances of closed circuits ------------------------------------ */

static int
group_find (int *group, int i)
{
  while (group[i] != i)
    i = group[i] = group[group[i]];
  return i;
}

/* The balances of a circuit without a boundary add up to nothing: one of them follows from the others, which the pattern does
 * not show.  Balances which share a flow form a group; where every flow of the group cancels, the last balance goes. */
static void
drop_dependent_balances (HlSystem *system)
{
  guint n = system->vars->len, n_equations = system->equations->len;
  g_autofree int *group = g_new (int, MAX (n, 1));
  g_autofree int *sum = g_new0 (int, MAX (n, 1));
  g_autofree gboolean *is_open = g_new0 (gboolean, MAX (n, 1));
  g_autofree gboolean *is_done = g_new0 (gboolean, MAX (n, 1));
  for (guint i = 0; i < n; i++)
    group[i] = (int) i;
  for (guint k = 0; k < n_equations; k++)
    {
      const HlEquation *e = hl_system_equation (system, k);
      const int *vars = hl_equation_vars (system, e);
      const double *sign = &g_array_index (system->constants, double, e->first_constant);
      if (!e->is_balance)
        continue;
      for (int i = 0; i < e->n; i++)
        {
          sum[vars[i]] += (int) sign[i];
          group[group_find (group, vars[i])] = group_find (group, vars[0]);
        }
    }
  for (guint i = 0; i < n; i++)
    if (sum[i] != 0)
      is_open[group_find (group, (int) i)] = TRUE;
  for (int k = (int) n_equations - 1; k >= 0; k--)
    {
      HlEquation *e = hl_system_equation (system, k);
      if (!e->is_balance)
        continue;
      int g = group_find (group, hl_equation_vars (system, e)[0]);
      e->is_dropped = !is_open[g] && !is_done[g];
      is_done[g] = TRUE;
    }
}

/* --- equations that only compute ------------------------------------------ */

typedef struct {
  HlSystem *system;
  int      *uses;           /* [n vars] equations that hold the variable and still stand */
  int      *computed_by;    /* [n vars] equation whose output it is; -1 */
  gboolean *is_peeled;      /* [n equations] */
  int      *order, n_order;
} Peel;

/* Is this the first place of the variable in the equation, and is it free? */
static gboolean
counts (const HlSystem *system, const int *vars, int k)
{
  if (system->fixed_by[vars[k]] >= 0)
    return FALSE;
  for (int j = 0; j < k; j++)
    if (vars[j] == vars[k])
      return FALSE;
  return TRUE;
}

static gboolean
can_peel (const Peel *peel, int var)
{
  return peel->uses[var] == 1 && peel->computed_by[var] >= 0 && !peel->is_peeled[peel->computed_by[var]];
}

/* A variable which only its own defining equation mentions waits until the end, and so, in turn, does what only it mentions. */
static void
peel_outputs (Peel *peel)
{
  HlSystem *system = peel->system;
  int n_stack = 0;
  g_autofree int *stack = g_new (int, system->vars->len + 1);
  for (guint v = 0; v < system->vars->len; v++)
    if (can_peel (peel, (int) v))
      stack[n_stack++] = (int) v;
  while (n_stack > 0)
    {
      int var = stack[--n_stack], k = peel->computed_by[var];
      const HlEquation *e = hl_system_equation (system, k);
      const int *vars = hl_equation_vars (system, e);
      peel->is_peeled[k] = TRUE;
      peel->order[peel->n_order++] = k;
      for (int i = 0; i < e->n; i++)
        if (counts (system, vars, i))
          {
            peel->uses[vars[i]]--;
            if (vars[i] != var && can_peel (peel, vars[i]))
              stack[n_stack++] = vars[i];
          }
    }
}

static void
peel_init (Peel *peel, HlSystem *system)
{
  guint n = system->vars->len;
  peel->system = system;
  peel->uses = g_new0 (int, MAX (n, 1));
  peel->computed_by = g_new (int, MAX (n, 1));
  peel->is_peeled = g_new0 (gboolean, system->equations->len + 1);
  peel->order = g_new (int, system->equations->len + 1);
  peel->n_order = 0;
  for (guint i = 0; i < n; i++)
    peel->computed_by[i] = -1;
  for (guint k = 0; k < system->equations->len; k++)
    {
      const HlEquation *e = hl_system_equation (system, k);
      const int *vars = hl_equation_vars (system, e);
      if (e->is_dropped)
        continue;
      for (int i = 0; i < e->n; i++)
        peel->uses[vars[i]] += counts (system, vars, i);
      if (e->output >= 0 && system->fixed_by[vars[e->output]] < 0)
        peel->computed_by[vars[e->output]] = (int) k;
    }
}

static void
peel_clear (Peel *peel)
{
  g_free (peel->uses);
  g_free (peel->computed_by);
  g_free (peel->is_peeled);
  g_free (peel->order);
}

/* --- the pattern and its decomposition ------------------------------------ */

typedef struct {
  int  n_rows, n_columns;
  int *equation_of, *var_of;
  cs  *pattern;
} Pattern;

static void
pattern_init (Pattern *pattern, const HlSystem *system, const Peel *peel)
{
  guint n = system->vars->len, n_equations = system->equations->len;
  g_autofree int *column_of = g_new (int, MAX (n, 1));
  pattern->equation_of = g_new (int, n_equations + 1);
  pattern->var_of = g_new (int, n + 1);
  pattern->n_rows = pattern->n_columns = 0;
  for (guint v = 0; v < n; v++)
    {
      column_of[v] = -1;
      if (system->root[v] != (int) v || system->fixed_by[v] >= 0)
        continue;
      if (peel->computed_by[v] >= 0 && peel->is_peeled[peel->computed_by[v]])
        continue;
      pattern->var_of[pattern->n_columns] = (int) v;
      column_of[v] = pattern->n_columns++;
    }
  /* By columns: count, then fill. */
  for (guint k = 0; k < n_equations; k++)
    if (!peel->is_peeled[k] && !hl_system_equation (system, k)->is_dropped)
      pattern->equation_of[pattern->n_rows++] = (int) k;
  pattern->pattern = cs_spalloc (MAX (pattern->n_rows, 1), MAX (pattern->n_columns, 1), MAX ((int) system->index->len, 1), 0, 0);
  cs *a = pattern->pattern;
  a->m = pattern->n_rows;
  a->n = pattern->n_columns;
  memset (a->p, 0, sizeof (int) * (gsize) (pattern->n_columns + 1));
  for (int pass = 0; pass < 2; pass++)
    {
      for (int row = 0; row < pattern->n_rows; row++)
        {
          const HlEquation *e = hl_system_equation (system, pattern->equation_of[row]);
          const int *vars = hl_equation_vars (system, e);
          for (int i = 0; i < e->n; i++)
            if (counts (system, vars, i))
              {
                int column = column_of[vars[i]];
                if (pass == 0)
                  a->p[column + 1]++;
                else
                  a->i[a->p[column]++] = row;
              }
        }
      if (pass == 0)
        for (int column = 0; column < pattern->n_columns; column++)
          a->p[column + 1] += a->p[column];
    }
  for (int column = pattern->n_columns; column > 0; column--)
    a->p[column] = a->p[column - 1];
  a->p[0] = 0;
}

static void
pattern_clear (Pattern *pattern)
{
  cs_spfree (pattern->pattern);
  g_free (pattern->equation_of);
  g_free (pattern->var_of);
}

/* The form of an equation that goes with what is sought of it. */
static void
choose_form (HlSystem *system, int equation, int var, int block_size)
{
  HlEquation *e = hl_system_equation (system, equation);
  if (e->in_block == NULL || (block_size == 1 && hl_equation_vars (system, e)[e->plain_for] == var))
    return;
  e->residual = e->in_block;
  e->in_block = NULL;
  e->linear = 0;
}

/* The fine blocks of the square part; they come upper triangular, so the last one is solved first. */
static void
take_blocks (HlStructure *s, HlSystem *system, const Pattern *pattern, const csd *dm)
{
  s->start = g_new (int, dm->nb + 1);
  s->equations = g_new (int, pattern->n_rows + 1);
  s->vars = g_new (int, pattern->n_columns + 1);
  s->start[0] = 0;
  for (int k = dm->nb - 1; k >= 0; k--)
    {
      int r0 = dm->r[k], r1 = dm->r[k + 1], c0 = dm->s[k], c1 = dm->s[k + 1];
      if (r0 < dm->rr[1] || r1 > dm->rr[2] || c0 < dm->cc[2] || c1 > dm->cc[3] || r1 - r0 != c1 - c0 || r1 == r0)
        continue;
      for (int i = 0; i < r1 - r0; i++)
        {
          s->equations[s->n_solved] = pattern->equation_of[dm->p[r0 + i]];
          s->vars[s->n_solved] = pattern->var_of[dm->q[c0 + i]];
          choose_form (system, s->equations[s->n_solved], s->vars[s->n_solved], r1 - r0);
          s->n_solved++;
        }
      s->largest = MAX (s->largest, r1 - r0);
      s->start[++s->n_blocks] = s->n_solved;
    }
}

static void
take_misfits (HlStructure *s, const HlSystem *system, const Pattern *pattern, const csd *dm)
{
  s->n_missing = dm->cc[2] - dm->rr[1];
  s->n_surplus = dm->rr[4] - dm->rr[2] - (dm->cc[4] - dm->cc[3]);
  s->open = g_new (int, dm->cc[2] + 1);
  for (int c = 0; c < dm->cc[2]; c++)
    s->open[s->n_open++] = pattern->var_of[dm->q[c]];
  s->open_equations = g_new (int, dm->rr[1] + 1);
  for (int r = 0; r < dm->rr[1]; r++)
    s->open_equations[s->n_open_equations++] = pattern->equation_of[dm->p[r]];
  s->over = g_new (int, dm->rr[4] - dm->rr[2] + 1);
  for (int r = dm->rr[2]; r < dm->rr[4]; r++)
    s->over[s->n_over++] = pattern->equation_of[dm->p[r]];
  s->is_open = g_new0 (gboolean, system->vars->len + 1);
  for (int k = 0; k < s->n_open; k++)
    s->is_open[s->open[k]] = TRUE;
}

/* What is computed last, in reverse of the order of peeling; open where anything that it needs is. */
static void
take_last (HlStructure *s, const HlSystem *system, const Peel *peel)
{
  s->last = g_new (int, peel->n_order + 1);
  for (int k = peel->n_order - 1; k >= 0; k--)
    {
      const HlEquation *e = hl_system_equation (system, peel->order[k]);
      const int *vars = hl_equation_vars (system, e);
      gboolean open = FALSE;
      for (int i = 0; i < e->n; i++)
        open |= s->is_open[vars[i]];
      s->is_open[vars[e->output]] = open;
      s->last[s->n_last++] = peel->order[k];
    }
}

HlStructure *
hl_structure_new (HlSystem *system)
{
  HlStructure *s = g_new0 (HlStructure, 1);
  g_atomic_ref_count_init (&s->ref_count);
  Peel peel;
  Pattern pattern;
  drop_dependent_balances (system);
  peel_init (&peel, system);
  peel_outputs (&peel);
  pattern_init (&pattern, system, &peel);
  csd *dm = cs_dmperm (pattern.pattern, 0);
  g_assert (dm != NULL);
  take_blocks (s, system, &pattern, dm);
  take_misfits (s, system, &pattern, dm);
  take_last (s, system, &peel);
  cs_dfree (dm);
  pattern_clear (&pattern);
  peel_clear (&peel);
  return s;
}

HlStructure *
hl_structure_ref (HlStructure *s)
{
  g_atomic_ref_count_inc (&s->ref_count);
  return s;
}

void
hl_structure_free (HlStructure *s)
{
  if (s == NULL || !g_atomic_ref_count_dec (&s->ref_count))
    return;
  g_free (s->start);
  g_free (s->equations);
  g_free (s->vars);
  g_free (s->last);
  g_free (s->open);
  g_free (s->open_equations);
  g_free (s->is_open);
  g_free (s->over);
  g_free (s);
}
