/* Numbers for the unknowns: block by block in triangular order, then a look at the whole.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "engine/numbers.h"
#include "engine/equations.h"
#include "engine/numbers-private.h"
#include <math.h>
#include <string.h>

#define MOST_SCALAR_STEPS 80
#define SCALAR_DONE       1e-13
#define POLISH_ABOVE      1e-11

/* Bounds inside which a single unknown is looked for. */
static void
bounds (HlVarKind kind, const HlFluidScale *scale, double *low, double *high)
{
  switch (kind)
    {
    case HL_VAR_PRESSURE: *low = log (scale->p_low); *high = log (scale->p_high); break;
    case HL_VAR_ENTHALPY: *low = scale->h_low; *high = scale->h_high; break;
    case HL_VAR_TEMPERATURE: *low = scale->T_low; *high = scale->T_high; break;
    case HL_VAR_ENTROPY: *low = scale->s_low; *high = scale->s_high; break;
    case HL_VAR_VOLUME: *low = scale->v_low; *high = scale->v_high; break;
    case HL_VAR_RATIO: *low = -2.0; *high = 2.0; break;
    default: *low = -INFINITY; *high = INFINITY;
    }
}

gboolean
hl_numbers_inside (const HlVar *var, double x)
{
  double low, high;
  bounds (var->kind, var->scale != NULL ? var->scale : hl_fluid_scale (hl_fluid_water ()), &low, &high);
  return x >= low && x <= high;
}

/* --- one unknown ---------------------------------------------------------- */

typedef struct {
  const HlEquation *equation;
  const double     *constants;
  const int        *vars;
  int               var;
  double            x[HL_EQUATION_MOST], dr[HL_EQUATION_MOST];
  double            scale;
  guint64           n;
} Scalar;

static gboolean
scalar_at (Scalar *s, double value, double *r, double *d)
{
  for (int k = 0; k < s->equation->n; k++)
    if (s->vars[k] == s->var)
      s->x[k] = value;
  s->n++;
  if (s->equation->residual (s->equation, s->constants, s->x, r, s->dr) != HL_OK || !isfinite (*r))
    return FALSE;
  *r /= s->scale;
  *d = 0.0;
  for (int k = 0; k < s->equation->n; k++)
    if (s->vars[k] == s->var)
      *d += s->dr[k] / s->scale;
  return isfinite (*d);
}

static void
scalar_init (Scalar *s, const HlSystem *system, int equation, int var)
{
  s->equation = hl_system_equation (system, equation);
  s->constants = &g_array_index (system->constants, double, s->equation->first_constant);
  s->vars = hl_equation_vars (system, s->equation);
  s->var = var;
  s->scale = hl_system_scale (system, s->equation->kind);
  s->n = 0;
  for (int k = 0; k < s->equation->n; k++)
    s->x[k] = system->x[s->vars[k]];
}

static gboolean
scalar_is_linear (const Scalar *s)
{
  int places = 0;
  for (int k = 0; k < s->equation->n; k++)
    if (s->vars[k] == s->var)
      {
        places++;
        if (!hl_equation_linear_in (s->equation, k))
          return FALSE;
      }
  return places == 1 || s->equation->linear == HL_ALL_LINEAR;
}

/* Looks over the bounds for a change of sign between neighbouring points, the nearest to @near first. */
static gboolean
scalar_bracket (Scalar *s, double low, double high, double near, double *a, double *b, double *least_at)
{
  enum { POINTS = 60 };
  double at[POINTS], r[POINTS], d, best = INFINITY, least = INFINITY;
  gboolean ok[POINTS], found = FALSE;
  for (int i = 0; i < POINTS; i++)
    {
      at[i] = low + (high - low) * i / (POINTS - 1);
      ok[i] = scalar_at (s, at[i], &r[i], &d);
      if (ok[i] && fabs (r[i]) < least)
        {
          least = fabs (r[i]);
          *least_at = at[i];
        }
    }
  for (int i = 0; i + 1 < POINTS; i++)
    if (ok[i] && ok[i + 1] && (r[i] <= 0.0) != (r[i + 1] <= 0.0) && fabs (at[i] - near) < best)
      {
        best = fabs (at[i] - near);
        *a = at[i];
        *b = at[i + 1];
        found = TRUE;
      }
  return found;
}

/* Newton inside a bracket, halving where a step would leave it. */
static gboolean
scalar_inside (Scalar *s, double a, double b, double unit, double *value)
{
  double ra, d, x = 0.5 * (a + b), r;
  if (!scalar_at (s, a, &ra, &d))
    return FALSE;
  for (int step = 0; step < 200; step++)
    {
      if (!scalar_at (s, x, &r, &d))
        return FALSE;
      if (fabs (r) <= SCALAR_DONE || fabs (b - a) <= 1e-14 * (fabs (x) + unit))
        {
          *value = x;
          return fabs (r) <= 1e-8;
        }
      if ((r <= 0.0) == (ra <= 0.0))
        a = x;
      else
        b = x;
      double next = fabs (d) > 0.0 ? x - r / d : NAN;
      if (!(next > fmin (a, b) && next < fmax (a, b)))
        next = 0.5 * (a + b);
      x = next;
    }
  return FALSE;
}

static gboolean
scalar_newton (Scalar *s, double low, double high, double unit, double cap, double *value)
{
  double x = fmin (fmax (*value, low), high), r, d, r_new, d_new;
  if (!scalar_at (s, x, &r, &d))
    return FALSE;
  for (int step = 0; step < MOST_SCALAR_STEPS; step++)
    {
      if (fabs (r) <= SCALAR_DONE)
        {
          *value = x;
          return TRUE;
        }
      if (!(fabs (d) * unit > 1e-14))
        return FALSE;
      double dx = fmin (fmax (-r / d, -cap), cap), t = 1.0;
      gboolean moved = FALSE;
      for (int half = 0; half < 12; half++, t *= 0.5)
        {
          double to = fmin (fmax (x + t * dx, low), high);
          if (scalar_at (s, to, &r_new, &d_new) && fabs (r_new) < fabs (r))
            {
              moved = TRUE;
              dx = to - x;
              x = to;
              r = r_new;
              d = d_new;
              break;
            }
        }
      if (!moved || fabs (dx) <= 1e-14 * (unit + fabs (x)))
        {
          *value = x;
          return fabs (r) <= 1e-10;
        }
    }
  return FALSE;
}

static void
count_calls (HlNumbers *numbers, const HlEquation *equation, guint64 n)
{
  numbers->n_evaluations += n;
  numbers->n_property_calls += n * (guint64) hl_equation_property_calls (equation);
}

HlFailed
hl_scalar_solve (HlSystem *system, int equation, int var, HlNumbers *numbers)
{
  Scalar s;
  double r, d, low, high, a, b, least_at = NAN;
  HlVarKind kind = hl_system_var (system, var)->kind;
  double unit = hl_system_scale (system, kind);
  HlFailed failed = HL_FAILED_NOT;
  scalar_init (&s, system, equation, var);
  /* An equation of a medium looks where that medium is, whoever owns the unknown. */
  const HlFluidScale *scale = s.equation->fluid != NULL ? hl_fluid_scale (s.equation->fluid) : hl_system_var (system, var)->scale;
  if (scale == NULL)
    scale = hl_fluid_scale (hl_fluid_water ());
  bounds (kind, scale, &low, &high);
  if (scalar_is_linear (&s))
    {
      double x = system->x[var];
      if (!scalar_at (&s, x, &r, &d))
        failed = HL_FAILED_RANGE;
      else if (!(fabs (d) * unit > 1e-12))
        failed = fabs (r) <= 1e-12 ? HL_FAILED_SINGULAR : HL_FAILED_STEPS;
      else
        system->x[var] = x - r / d;
      count_calls (numbers, s.equation, s.n);
      return failed;
    }
  double cap = kind == HL_VAR_PRESSURE ? 1.0 : kind == HL_VAR_ENTHALPY ? 8e5 / 2108e3 * scale->h_step : INFINITY, value = system->x[var];
  if (!scalar_newton (&s, low, high, unit, cap, &value))
    {
      failed = HL_FAILED_STEPS;
      if (isfinite (low) && scalar_bracket (&s, low, high, system->x[var], &a, &b, &least_at) && scalar_inside (&s, a, b, unit, &value))
        failed = HL_FAILED_NOT;
      else if (!isnan (least_at))
        value = least_at;
      else if (isfinite (low))
        failed = HL_FAILED_RANGE;
    }
  system->x[var] = value;
  count_calls (numbers, s.equation, s.n);
  return failed;
}

/* --- the whole ------------------------------------------------------------- */

static double
worst_residual (HlSystem *system, const HlStructure *structure, int n_equations, int *worst, HlNumbers *numbers)
{
  double largest = 0.0, r, dr[HL_EQUATION_MOST];
  for (int k = 0; k < n_equations; k++)
    {
      int equation = structure->equations[k];
      count_calls (numbers, hl_system_equation (system, equation), 1);
      double scale = hl_system_scale (system, hl_system_equation (system, equation)->kind);
      double value = hl_system_evaluate (system, equation, &r, dr) == HL_OK ? fabs (r) / scale : INFINITY;
      if (value > largest || *worst < 0)
        {
          largest = fmax (largest, value);
          *worst = equation;
        }
    }
  return largest;
}

/* What is only computed; an equation that cannot be evaluated leaves its quantity unknown. */
static void
compute_last (HlSystem *system, const HlStructure *structure, HlNumbers *numbers)
{
  double r, dr[HL_EQUATION_MOST];
  for (int k = 0; k < structure->n_last; k++)
    {
      const HlEquation *e = hl_system_equation (system, structure->last[k]);
      const int *vars = hl_equation_vars (system, e);
      int output = vars[e->output];
      gboolean known = TRUE;
      for (int i = 0; i < e->n; i++)
        known &= vars[i] == output || numbers->is_known[vars[i]];
      if (known)
        count_calls (numbers, e, 1);
      if (!known || hl_system_evaluate (system, structure->last[k], &r, dr) != HL_OK || !(fabs (dr[e->output]) > 0.0))
        continue;
      double value = system->x[output] - r / dr[e->output];
      if (!isfinite (value))
        continue;
      system->x[output] = value;
      numbers->is_known[output] = TRUE;
    }
}

void
hl_numbers_solve (HlSystem *system, const HlStructure *structure, const HlUsual *usual, HlNumbers *numbers)
{
  memset (numbers, 0, sizeof *numbers);
  numbers->block = -1;
  numbers->worst = -1;
  numbers->is_known = g_new0 (gboolean, system->vars->len + 1);
  for (guint v = 0; v < system->vars->len; v++)
    numbers->is_known[v] = system->fixed_by[v] >= 0;
  HlBlockWork *work = hl_block_work_new (system);
  int k;
  for (k = 0; k < structure->n_blocks; k++)
    {
      int first = structure->start[k], n = structure->start[k + 1] - first;
      HlFailed failed = n == 1
        ? hl_scalar_solve (system, structure->equations[first], structure->vars[first], numbers)
        : hl_block_solve (work, structure->equations + first, structure->vars + first, n, usual, numbers);
      if (failed != HL_FAILED_NOT)
        {
          numbers->failed = failed;
          numbers->block = k;
          if (n == 1)
            {
              numbers->worst = structure->equations[first];
              numbers->n_null = 1;
              numbers->null_vars[0] = structure->vars[first];
            }
          break;
        }
      for (int i = first; i < first + n; i++)
        numbers->is_known[structure->vars[i]] = TRUE;
    }
  if (numbers->failed == HL_FAILED_NOT && structure->n_solved > 0)
    {
      int worst = -1;
      numbers->residual = worst_residual (system, structure, structure->n_solved, &worst, numbers);
      if (numbers->residual > POLISH_ABOVE)
        {
          hl_block_polish (work, structure->equations, structure->vars, structure->n_solved, numbers);
          worst = -1;
          numbers->residual = worst_residual (system, structure, structure->n_solved, &worst, numbers);
        }
      if (!(numbers->residual <= 1e-8))
        {
          numbers->failed = HL_FAILED_STEPS;
          numbers->worst = worst;
        }
    }
  hl_block_work_free (work);
  compute_last (system, structure, numbers);
}

/* Nothing is solved: only what was put in is known. */
void
hl_numbers_skip (HlSystem *system, HlNumbers *numbers)
{
  memset (numbers, 0, sizeof *numbers);
  numbers->block = numbers->worst = -1;
  numbers->is_known = g_new0 (gboolean, system->vars->len + 1);
  for (guint v = 0; v < system->vars->len; v++)
    numbers->is_known[v] = system->fixed_by[v] >= 0;
}
