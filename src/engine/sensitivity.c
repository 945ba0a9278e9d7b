/* Derivatives of results with respect to what was put in: one backward pass through the blocks (adjoint).
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "engine/solution-private.h"
#include "engine/dense.h"
#include <math.h>
#include <string.h>

/* d result / d x of every variable, carried as the system carries them: what is known of it so far. */
typedef struct {
  const HlSolution *solution;
  HlSystem         *system;
  double           *slope;       /* [n vars] of roots */
} Adjoint;

static void
seed (Adjoint *a, int var, double slope)
{
  const HlSystem *system = a->system;
  double unit = hl_system_var (system, var)->kind == HL_VAR_PRESSURE ? hl_system_value (system, var) : 1.0;
  a->slope[system->root[var]] += slope * unit;
}

static gboolean
seed_state (Adjoint *a, int n, char letter, double factor)
{
  const HlNode *node = hl_model_node (a->solution->model, n);
  const HlNodeResult *at = &a->solution->states[n];
  HlState st;
  HlSaturation sat;
  double to_p, to_h;
  if (!at->has_state || hl_fluid_state_ph (node->fluid, at->p, hl_system_value (a->system, node->h), &st) != HL_OK)
    return FALSE;
  switch (letter)
    {
    case 'm': seed (a, node->m, factor); return TRUE;
    case 'p': to_p = 1.0; to_h = 0.0; break;
    case 'h': to_p = 0.0; to_h = 1.0; break;
    case 'T': to_p = st.T_p; to_h = st.T_h; break;
    case 's': to_p = st.s_p; to_h = st.s_h; break;
    case 'v': to_p = st.v_p; to_h = st.v_h; break;
    case 'e': to_p = -a->solution->exergy->T0 * st.s_p; to_h = 1.0 - a->solution->exergy->T0 * st.s_h; break;
    case 'x':
      if (isnan (at->st.x) || hl_fluid_saturation_p (node->fluid, at->p, &sat) != HL_OK)
        return FALSE;
      to_h = 1.0 / (sat.h_vapour - sat.h_liquid);
      to_p = -(sat.h_liquid_p + at->st.x * (sat.h_vapour_p - sat.h_liquid_p)) * to_h;
      break;
    default: return FALSE;
    }
  seed (a, node->p, factor * to_p);
  seed (a, node->h, factor * to_h);
  return TRUE;
}

static void
seed_exergy (gpointer data, int var, double slope)
{
  seed (data, var, slope);
}

/* Results that are read over all states. */
static gboolean
seed_plant (Adjoint *a, const char *key)
{
  const HlSolution *solution = a->solution;
  const HlModel *model = solution->model;
  int low, high, wettest = -1;
  if (g_str_has_prefix (key, "exergy_"))
    return hl_exergy_slopes (solution, -1, key, seed_exergy, a);
  if (g_str_equal (key, "carnot_efficiency") && hl_results_extremes (solution, &low, &high))
    {
      double T_low = solution->states[low].st.T, T_high = solution->states[high].st.T;
      return seed_state (a, low, 'T', -1.0 / T_high) && seed_state (a, high, 'T', T_low / (T_high * T_high));
    }
  for (guint c = 0; g_str_equal (key, "exhaust_moisture") && c < hl_plant_n_components (solution->plant); c++)
    {
      int var = hl_model_own_var (model, (int) c, "exhaust_moisture");
      if (var >= 0 && (wettest < 0 || hl_system_value (a->system, var) > hl_system_value (a->system, wettest)))
        wettest = var;
    }
  if (wettest < 0)
    return FALSE;
  seed (a, wettest, 1.0);
  return TRUE;
}

static gboolean
seed_result (Adjoint *a, const HlAddress *result)
{
  int node, var = hl_model_find_var (a->solution->model, result);
  char letter;
  if (var >= 0)
    {
      seed (a, var, 1.0);
      return TRUE;
    }
  if (hl_model_find_state (a->solution->model, result, &node, &letter))
    return seed_state (a, node, letter, 1.0);
  if (result->owner == HL_OWNER_PLANT)
    return seed_plant (a, result->key);
  int component = result->owner == HL_OWNER_COMPONENT ? hl_plant_component_index (a->solution->plant, result->id) : -1;
  return component >= 0 && hl_exergy_slopes (a->solution, component, result->key, seed_exergy, a);
}

/* Back through one block: its matrix transposed takes the slopes of its variables to those of its equations, and they pass on
 * to what the equations took from before.  @place: [n vars] of all -1, left so. */
static gboolean
back_through (Adjoint *a, const int *equations, const int *vars, int n, int *place)
{
  double dr[HL_EQUATION_MOST], r;
  g_autofree double *matrix = g_new0 (double, (gsize) n * (gsize) n), *weight = g_new (double, n);
  g_autofree int *pivot = g_new (int, n);
  for (int v = 0; v < n; v++)
    {
      place[vars[v]] = v;
      weight[v] = a->slope[vars[v]];
      a->slope[vars[v]] = 0.0;
    }
  gboolean is_good = TRUE;
  for (int pass = 0; pass < 2 && is_good; pass++)
    {
      for (int e = 0; e < n && is_good; e++)
        {
          const HlEquation *equation = hl_system_equation (a->system, equations[e]);
          const int *own = hl_equation_vars (a->system, equation);
          is_good = hl_system_evaluate (a->system, equations[e], &r, dr) == HL_OK;
          double unit = hl_system_scale (a->system, equation->kind);
          for (int k = 0; k < equation->n && is_good; k++)
            if (pass == 0 && place[own[k]] >= 0)
              matrix[place[own[k]] * n + e] += dr[k] / unit * hl_system_scale (a->system, hl_system_var (a->system, own[k])->kind);
            else if (pass == 1 && place[own[k]] < 0)
              a->slope[own[k]] -= weight[e] * dr[k] / unit;
        }
      if (pass == 0 && is_good)
        {
          for (int v = 0; v < n; v++)
            weight[v] *= hl_system_scale (a->system, hl_system_var (a->system, vars[v])->kind);
          is_good = hl_dense_factor (n, matrix, pivot, 1e-15) == 0;
          hl_dense_solve (n, matrix, pivot, weight);
        }
    }
  for (int v = 0; v < n; v++)
    place[vars[v]] = -1;
  return is_good;
}

static gboolean
run (Adjoint *a)
{
  const HlStructure *s = a->solution->structure;
  g_autofree int *place = g_new (int, a->system->vars->len + 1);
  memset (place, -1, sizeof (int) * (a->system->vars->len + 1));
  for (int k = s->n_last - 1; k >= 0; k--)
    {
      const HlEquation *e = hl_system_equation (a->system, s->last[k]);
      int var = hl_equation_vars (a->system, e)[e->output];
      if (fabs (a->slope[var]) > 0.0 && !back_through (a, &s->last[k], &var, 1, place))
        return FALSE;
    }
  for (int k = s->n_blocks - 1; k >= 0; k--)
    {
      gboolean matters = FALSE;
      for (int i = s->start[k]; i < s->start[k + 1]; i++)
        matters |= fabs (a->slope[s->vars[i]]) > 0.0;
      if (matters && !back_through (a, s->equations + s->start[k], s->vars + s->start[k], s->start[k + 1] - s->start[k], place))
        return FALSE;
    }
  return TRUE;
}

/* Variables that some equation holds, or the result itself: of others no derivative is known. */
static gboolean *
find_used (const HlSystem *system, const double *slope)
{
  gboolean *is_used = g_new0 (gboolean, system->vars->len + 1);
  for (guint k = 0; k < system->vars->len; k++)
    is_used[k] = fabs (slope[k]) > 0.0;
  for (guint k = 0; k < system->index->len; k++)
    is_used[g_array_index (system->index, int, k)] = TRUE;
  return is_used;
}

GArray *
hl_solution_sensitivities (const HlSolution *solution, const HlAddress *result)
{
  g_return_val_if_fail (solution != NULL && result != NULL, NULL);
  if (!solution->is_complete)
    return NULL;
  HlSystem *system = solution->model->system;
  g_autofree double *slope = g_new0 (double, system->vars->len + 1);
  Adjoint a = { solution, system, slope };
  if (!seed_result (&a, result) || !run (&a))
    return NULL;
  g_autofree gboolean *is_used = find_used (system, slope);
  GArray *list = g_array_new (FALSE, FALSE, sizeof (HlSensitivity));
  for (guint k = 0; k < system->specs->len; k++)
    {
      const HlSpec *spec = hl_system_spec (system, k);
      int root = system->root[spec->var];
      if (spec->origin == HL_ORIGIN_TIED || spec->address.key[0] == '\0' || system->fixed_by[root] != (int) k || !is_used[root])
        continue;
      HlSensitivity s = { spec->address, hl_system_value (system, spec->var), slope[root] };
      if (hl_system_var (system, spec->var)->kind == HL_VAR_PRESSURE)
        s.derivative /= s.value;
      g_array_append_val (list, s);
    }
  return list;
}

gboolean
hl_solution_sensitivity (const HlSolution *solution, const HlAddress *result, const HlAddress *given, double *value)
{
  g_return_val_if_fail (solution != NULL && result != NULL && given != NULL && value != NULL, FALSE);
  g_autoptr (GArray) list = hl_solution_sensitivities (solution, result);
  int var = hl_model_find_var (solution->model, given);
  for (guint k = 0; list != NULL && k < list->len; k++)
    {
      const HlSensitivity *s = &g_array_index (list, HlSensitivity, k);
      int other = hl_model_find_var (solution->model, &s->given);
      if (!hl_address_equal (&s->given, given)
          && (var < 0 || other < 0 || solution->model->system->root[var] != solution->model->system->root[other]))
        continue;
      *value = s->derivative;
      return TRUE;
    }
  return FALSE;
}
