/* Damped Newton for blocks of several unknowns: dense where small, KLU where large.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "engine/numbers-private.h"
#include "engine/dense.h"
#include "engine/equations.h"
#include <klu.h>
#include <math.h>
#include <string.h>

#define DENSE_MOST      20        /* unknowns up to which the dense solver is the faster one */
#define MOST_STEPS      80
#define DONE            1e-12     /* scaled residual aimed at */
#define GOOD_ENOUGH     1e-9      /* scaled residual with which a stalled iteration may end */
#define SINGULAR_ABOVE  1e12      /* condition estimate */
#define N_STARTS        6

struct _HlBlockWork {
  HlSystem *system;
  int       capacity;
  int       n;                    /* of the present block */
  const int *equations, *vars;
  int      *column_of;            /* [n vars] column in the present block; -1 */
  double   *x, *x_try, *f, *f_try, *step, *unit;
  const double *offset;           /* [n] scaled, added to the residuals; NULL: none */
  double   *dense;
  int      *pivot;
  /* KLU */
  klu_common common;
  klu_symbolic *symbolic;
  klu_numeric  *numeric;
  int      *ap, *ai, *slot, n_slots;
  double   *ax;
  int       n_lifted;
  int       n_bold;               /* steps at the beginning that may make things worse */
  gboolean  keeps_flows;          /* none turns round on the way */
  double    condition;            /* of the last matrix that solved a block */
};

HlBlockWork *
hl_block_work_new (HlSystem *system)
{
  HlBlockWork *w = g_new0 (HlBlockWork, 1);
  w->system = system;
  w->column_of = g_new (int, system->vars->len + 1);
  for (guint i = 0; i <= system->vars->len; i++)
    w->column_of[i] = -1;
  klu_defaults (&w->common);
  return w;
}

HlSystem *
hl_block_system (HlBlockWork *w)
{
  return w->system;
}

void
hl_block_keep_flows (HlBlockWork *w, gboolean keeps)
{
  w->keeps_flows = keeps;
}

void
hl_block_set_bold (HlBlockWork *w, int n_steps)
{
  w->n_bold = n_steps;
}

static void
drop_factors (HlBlockWork *w)
{
  if (w->numeric != NULL)
    klu_free_numeric (&w->numeric, &w->common);
  if (w->symbolic != NULL)
    klu_free_symbolic (&w->symbolic, &w->common);
}

void
hl_block_work_free (HlBlockWork *w)
{
  drop_factors (w);
  g_free (w->column_of);
  g_free (w->x);
  g_free (w->dense);
  g_free (w->pivot);
  g_free (w->ap);
  g_free (w->ai);
  g_free (w->slot);
  g_free (w->ax);
  g_free (w);
}

static void
reserve (HlBlockWork *w, int n)
{
  if (n <= w->capacity)
    return;
  w->capacity = n;
  w->x = g_realloc_n (w->x, 6 * (gsize) n, sizeof (double));
  w->dense = g_realloc_n (w->dense, n <= DENSE_MOST ? (gsize) n * (gsize) n : DENSE_MOST * DENSE_MOST, sizeof (double));
  w->pivot = g_realloc_n (w->pivot, (gsize) n, sizeof (int));
}

/* The pattern by columns, and for each equation's variables the place of their derivative in it. */
static void
make_pattern (HlBlockWork *w)
{
  HlSystem *system = w->system;
  int n_entries = 0;
  for (int i = 0; i < w->n; i++)
    n_entries += hl_system_equation (system, w->equations[i])->n;
  w->ap = g_realloc_n (w->ap, (gsize) w->n + 1, sizeof (int));
  w->ai = g_realloc_n (w->ai, (gsize) n_entries + 1, sizeof (int));
  w->ax = g_realloc_n (w->ax, (gsize) n_entries + 1, sizeof (double));
  w->slot = g_realloc_n (w->slot, (gsize) n_entries + 1, sizeof (int));
  memset (w->ap, 0, sizeof (int) * ((gsize) w->n + 1));
  g_autofree int *next = g_new (int, w->n + 1);
  for (int pass = 0; pass < 2; pass++)
    {
      int place = 0;
      for (int i = 0; i < w->n; i++)
        {
          const HlEquation *e = hl_system_equation (system, w->equations[i]);
          const int *vars = hl_equation_vars (system, e);
          for (int k = 0; k < e->n; k++, place++)
            {
              int column = w->column_of[vars[k]], twin = -1;
              if (column < 0)
                {
                  if (pass == 1)
                    w->slot[place] = -1;
                  continue;
                }
              for (int j = 0; j < k && twin < 0; j++)
                if (vars[j] == vars[k])
                  twin = j;
              if (pass == 0)
                w->ap[column + 1] += twin < 0;
              else if (twin >= 0)
                w->slot[place] = w->slot[place - k + twin];
              else
                {
                  w->slot[place] = next[column]++;
                  w->ai[w->slot[place]] = i;
                }
            }
        }
      if (pass == 0)
        for (int column = 0; column < w->n; column++)
          {
            w->ap[column + 1] += w->ap[column];
            next[column] = w->ap[column];
          }
    }
  w->n_slots = w->ap[w->n];
}

static void
begin (HlBlockWork *w, const int *equations, const int *vars, int n)
{
  reserve (w, n);
  w->n = n;
  w->equations = equations;
  w->vars = vars;
  w->x_try = w->x + n;
  w->f = w->x + 2 * n;
  w->step = w->x + 3 * n;
  w->unit = w->x + 4 * n;
  w->f_try = w->x + 5 * n;
  for (int i = 0; i < n; i++)
    {
      w->column_of[vars[i]] = i;
      w->x[i] = w->system->x[vars[i]];
      w->unit[i] = hl_system_scale (w->system, hl_system_var (w->system, vars[i])->kind);
    }
  drop_factors (w);
  if (n > DENSE_MOST)
    {
      make_pattern (w);
      w->symbolic = klu_analyze (n, w->ap, w->ai, &w->common);
    }
}

static void
end (HlBlockWork *w)
{
  for (int i = 0; i < w->n; i++)
    w->column_of[w->vars[i]] = -1;
  drop_factors (w);
}

/* Residuals at @x, scaled; with @derivatives also the scaled matrix.  FALSE where one cannot be evaluated. */
static gboolean
evaluate (HlBlockWork *w, const double *x, gboolean derivatives, double *f, HlNumbers *numbers)
{
  HlSystem *system = w->system;
  int n = w->n, place = 0;
  double dr[HL_EQUATION_MOST];
  for (int i = 0; i < n; i++)
    system->x[w->vars[i]] = x[i];
  if (derivatives && n <= DENSE_MOST)
    memset (w->dense, 0, sizeof (double) * (gsize) n * (gsize) n);
  else if (derivatives)
    memset (w->ax, 0, sizeof (double) * (gsize) w->n_slots);
  for (int i = 0; i < n; i++)
    {
      const HlEquation *e = hl_system_equation (system, w->equations[i]);
      const int *vars = hl_equation_vars (system, e);
      double scale = 1.0 / hl_system_scale (system, e->kind);
      numbers->n_evaluations++;
      numbers->n_property_calls += (guint64) hl_equation_property_calls (e);
      if (hl_system_evaluate (system, w->equations[i], &f[i], dr) != HL_OK)
        {
          numbers->worst = w->equations[i];
          return FALSE;
        }
      f[i] = f[i] * scale + (w->offset != NULL ? w->offset[i] : 0.0);
      if (!derivatives)
        continue;
      for (int k = 0; k < e->n; k++)
        {
          int column = w->column_of[vars[k]];
          if (column < 0)
            continue;
          double value = dr[k] * scale * w->unit[column];
          if (n <= DENSE_MOST)
            w->dense[i * n + column] += value;
          else
            w->ax[w->slot[place + k]] += value;
        }
      place += e->n;
    }
  return TRUE;
}

/* Newton step into w->step, scaled.  FALSE where the matrix is of no use. */
static gboolean
newton_step (HlBlockWork *w)
{
  int n = w->n;
  for (int i = 0; i < n; i++)
    w->step[i] = -w->f[i];
  if (n <= DENSE_MOST)
    {
      w->n_lifted = hl_dense_factor (n, w->dense, w->pivot, 1e-14);
      hl_dense_solve (n, w->dense, w->pivot, w->step);
    }
  else
    {
      if (w->symbolic == NULL)
        return FALSE;
      if (w->numeric == NULL)
        w->numeric = klu_factor (w->ap, w->ai, w->ax, w->symbolic, &w->common);
      else if (!klu_refactor (w->ap, w->ai, w->ax, w->symbolic, w->numeric, &w->common) || w->common.status != KLU_OK)
        {
          klu_free_numeric (&w->numeric, &w->common);
          w->numeric = klu_factor (w->ap, w->ai, w->ax, w->symbolic, &w->common);
        }
      w->n_lifted = w->numeric == NULL || w->common.status != KLU_OK;
      if (w->numeric == NULL)
        return FALSE;
      klu_solve (w->symbolic, w->numeric, n, 1, w->step, &w->common);
    }
  for (int i = 0; i < n; i++)
    if (!isfinite (w->step[i]))
      return FALSE;
  return TRUE;
}

static double
largest_of (const double *f, int n, int *at)
{
  double largest = 0.0;
  *at = 0;
  for (int i = 0; i < n; i++)
    if (fabs (f[i]) > largest)
      {
        largest = fabs (f[i]);
        *at = i;
      }
  return largest;
}

static double
merit_of (const double *f, int n)
{
  double sum = 0.0;
  for (int i = 0; i < n; i++)
    sum += f[i] * f[i];
  return sum;
}

/* Heat of evaporation as a part of that of water, which steps and swings are stated for. */
static double
enthalpy_step (const HlFluidScale *scale)
{
  return scale != NULL ? (hl_fluid_scale_enthalpy (scale, 1e6) - hl_fluid_scale_enthalpy (scale, 0.0)) / 1e6 : 1.0;
}

/* How much of the step may be taken: pressures by a factor of two, enthalpies by a fifth of the heat of evaporation (400 kJ/kg of
 * water), temperatures by 100 K; flows not to zero, where that is wanted. */
static double
step_cap (const HlBlockWork *w)
{
  double t = 1.0;
  for (int i = 0; i < w->n; i++)
    {
      double cap;
      switch (hl_system_var (w->system, w->vars[i])->kind)
        {
        case HL_VAR_PRESSURE: cap = 0.7; break;
        case HL_VAR_ENTHALPY: cap = 0.4 * enthalpy_step (hl_system_var (w->system, w->vars[i])->scale); break;
        case HL_VAR_TEMPERATURE: cap = 0.33; break;
        case HL_VAR_RATIO: cap = 1.0; break;
        case HL_VAR_FLOW:
          if (!w->keeps_flows || !(w->x[i] > 0.0 && w->step[i] < 0.0))
            continue;
          cap = 0.9 * w->x[i] / w->unit[i];
          break;
        default: continue;
        }
      if (fabs (w->step[i]) * t > cap)
        t = cap / fabs (w->step[i]);
    }
  return t;
}

/* Runs Newton from w->x; w->x is the best point in the end. */
static HlFailed
iterate (HlBlockWork *w, HlNumbers *numbers)
{
  int n = w->n, worst = 0;
  if (!evaluate (w, w->x, TRUE, w->f, numbers))
    return HL_FAILED_RANGE;
  double largest = largest_of (w->f, n, &worst), merit = merit_of (w->f, n);
  for (int step = 0; step < MOST_STEPS; step++)
    {
      numbers->worst = w->equations[worst];
      numbers->residual = largest;
      numbers->n_iterations++;
      if (!newton_step (w))
        return largest <= GOOD_ENOUGH ? HL_FAILED_NOT : HL_FAILED_SINGULAR;
      if (largest <= DONE)
        return HL_FAILED_NOT;
      /* The first trial is mostly the one taken, so its derivatives come along. */
      double t = step_cap (w), moved = 0.0;
      gboolean accepted = FALSE;
      for (int half = 0; half < 25 && !accepted; half++, t *= 0.5)
        {
          moved = 0.0;
          for (int i = 0; i < n; i++)
            {
              w->x_try[i] = w->x[i] + t * w->step[i] * w->unit[i];
              moved = fmax (moved, t * fabs (w->step[i]));
            }
          accepted = evaluate (w, w->x_try, TRUE, w->f_try, numbers) && (step < w->n_bold || merit_of (w->f_try, n) < merit * (1.0 - 1e-4 * t));
        }
      if (!accepted && largest > GOOD_ENOUGH)
        return w->n_lifted > 0 ? HL_FAILED_SINGULAR : HL_FAILED_STEPS;
      if (!accepted)
        return evaluate (w, w->x, TRUE, w->f, numbers) && newton_step (w) ? HL_FAILED_NOT : HL_FAILED_STEPS;
      memcpy (w->x, w->x_try, sizeof (double) * (gsize) n);
      memcpy (w->f, w->f_try, sizeof (double) * (gsize) n);
      largest = largest_of (w->f, n, &worst);
      merit = merit_of (w->f, n);
      if (moved <= 1e-13 && largest <= GOOD_ENOUGH)
        {
          newton_step (w);
          return HL_FAILED_NOT;
        }
    }
  return HL_FAILED_STEPS;
}

/* Variables with large entries in the direction that the matrix hardly moves. */
static void
name_null (HlBlockWork *w, HlNumbers *numbers)
{
  int n = w->n;
  g_autofree double *a = g_new0 (double, (gsize) n * (gsize) n);
  g_autofree double *v = g_new (double, n);
  g_autofree int *pivot = g_new (int, n);
  double dr[HL_EQUATION_MOST], r;
  for (int i = 0; i < n; i++)
    {
      const HlEquation *e = hl_system_equation (w->system, w->equations[i]);
      const int *vars = hl_equation_vars (w->system, e);
      if (hl_system_evaluate (w->system, w->equations[i], &r, dr) != HL_OK)
        return;
      for (int k = 0; k < e->n; k++)
        if (w->column_of[vars[k]] >= 0)
          a[i * n + w->column_of[vars[k]]] += dr[k] / hl_system_scale (w->system, e->kind) * w->unit[w->column_of[vars[k]]];
    }
  hl_dense_factor (n, a, pivot, 1e-15);
  numbers->condition = fmax (numbers->condition, 1.0 / fmax (hl_dense_null (n, a, pivot, v), 1e-300));
  numbers->n_null = 0;
  for (int i = 0; i < n && numbers->n_null < HL_NULL_MOST; i++)
    if (fabs (v[i]) > 0.2)
      numbers->null_vars[numbers->n_null++] = w->vars[i];
}

/* Condition of the last matrix: an estimate by KLU, or the spread of the pivots where dense. */
static double
condition_of (HlBlockWork *w)
{
  if (w->n > DENSE_MOST)
    {
      if (w->numeric == NULL || !klu_condest (w->ap, w->ax, w->symbolic, w->numeric, &w->common))
        return INFINITY;
      return w->common.condest;
    }
  double least = INFINITY, largest = 0.0;
  for (int i = 0; i < w->n; i++)
    {
      least = fmin (least, fabs (w->dense[i * w->n + i]));
      largest = fmax (largest, fabs (w->dense[i * w->n + i]));
    }
  return least > 0.0 ? largest / least : INFINITY;
}

/* Other starts, always the same ones: every unknown at its usual value, then stretched this way and that. */
static void
other_start (HlBlockWork *w, int number)
{
  for (int i = 0; i < w->n; i++)
    {
      const HlVar *var = hl_system_var (w->system, w->vars[i]);
      double usual = hl_system_start (var, w->system->flow_scale);
      double swing = sin (2.3 * number + 1.1 * i * (number - 1));
      switch (var->kind)
        {
        case HL_VAR_PRESSURE: usual += number == 1 ? 0.0 : 1.5 * swing; break;
        /* Water's enthalpies are counted from cold liquid, those of other media from anywhere. */
        case HL_VAR_ENTHALPY:
          if (var->scale == NULL || var->scale == hl_fluid_scale (hl_fluid_water ()))
            usual *= number == 1 ? 1.0 : 1.0 + 0.25 * swing;
          else
            usual += number == 1 ? 0.0 : (0.4 + 0.6 * swing) * var->scale->h_step;
          break;
        case HL_VAR_TEMPERATURE: usual += number == 1 ? 0.0 : 60.0 * swing; break;
        case HL_VAR_FLOW: usual *= number == 1 ? 1.0 : number == 2 ? 0.1 : 1.0 + 0.5 * swing; break;
        default: break;
        }
      w->x[i] = usual;
    }
}

/* From where the unknowns stand, with what is wanted of the equations shifted by @offset; ends at the best point found. */
HlFailed
hl_block_newton (HlBlockWork *w, const int *equations, const int *vars, int n, const double *offset, HlNumbers *numbers)
{
  begin (w, equations, vars, n);
  w->offset = offset;
  HlFailed failed = iterate (w, numbers);
  for (int i = 0; i < n; i++)
    w->system->x[vars[i]] = w->x[i];
  if (failed == HL_FAILED_NOT)
    {
      w->condition = condition_of (w);
      if (!(w->condition <= SINGULAR_ABOVE))
        failed = HL_FAILED_SINGULAR;
    }
  w->offset = NULL;
  end (w);
  return failed;
}

static HlFailed
start_otherwise (HlBlockWork *w, const int *equations, const int *vars, int n, int number, HlNumbers *numbers)
{
  begin (w, equations, vars, n);
  other_start (w, number);
  for (int i = 0; i < n; i++)
    w->system->x[vars[i]] = w->x[i];
  end (w);
  return hl_block_newton (w, equations, vars, n, NULL, numbers);
}

/* Where the start at hand leads nowhere: what the block would be with usual values, and from there on; then other starts. */
HlFailed
hl_block_solve (HlBlockWork *w, const int *equations, const int *vars, int n, const HlUsual *usual, HlNumbers *numbers)
{
  HlSystem *system = w->system;
  gboolean usual_first = usual != NULL && usual->first;
  w->keeps_flows = usual_first && usual->variant % 2 == 0;
  HlFailed failed = usual_first ? hl_block_relax (w, equations, vars, n, usual, numbers) : hl_block_newton (w, equations, vars, n, NULL, numbers);
  if (failed != HL_FAILED_NOT)
    {
      HlFailed first_failed = failed;
      int first_worst = numbers->worst;
      double first_residual = numbers->residual;
      g_autofree double *first_x = g_new (double, n);
      for (int i = 0; i < n; i++)
        first_x[i] = system->x[vars[i]];
      if (usual != NULL && !usual_first)
        failed = hl_block_relax (w, equations, vars, n, usual, numbers);
      for (int start = 1; failed != HL_FAILED_NOT && start < N_STARTS; start++)
        failed = start_otherwise (w, equations, vars, n, start, numbers);
      if (failed != HL_FAILED_NOT)
        {
          failed = first_failed;
          numbers->worst = first_worst;
          numbers->residual = first_residual;
          for (int i = 0; i < n; i++)
            system->x[vars[i]] = first_x[i];
        }
    }
  if (failed == HL_FAILED_NOT)
    numbers->condition = fmax (numbers->condition, w->condition);
  if (failed == HL_FAILED_SINGULAR)
    {
      begin (w, equations, vars, n);
      name_null (w, numbers);
      end (w);
    }
  return failed;
}

void
hl_block_polish (HlBlockWork *w, const int *equations, const int *vars, int n, HlNumbers *numbers)
{
  int worst;
  begin (w, equations, vars, n);
  g_autofree double *best = g_memdup2 (w->x, sizeof (double) * (gsize) n);
  double least = INFINITY;
  for (int step = 0; step < 4; step++)
    {
      if (!evaluate (w, w->x, TRUE, w->f, numbers))
        break;
      double largest = largest_of (w->f, n, &worst);
      if (!(largest < least))
        break;
      least = largest;
      memcpy (best, w->x, sizeof (double) * (gsize) n);
      numbers->n_iterations++;
      if (largest <= DONE || !newton_step (w))
        break;
      for (int i = 0; i < n; i++)
        w->x[i] += w->step[i] * w->unit[i];
    }
  for (int i = 0; i < n; i++)
    w->system->x[vars[i]] = best[i];
  end (w);
}
