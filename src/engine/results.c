/* What follows from the solved unknowns: states of all streams, results of the plant, processes.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "engine/solution-private.h"
#include "engine/circuits.h"
#include "engine/components/components.h"
#include <math.h>

/* A state quantity that was put in reads back as it is, where the state that was found of it agrees to rounding. */
static void
put_in (const HlSystem *system, int var, double *value)
{
  if (var < 0 || system->fixed_by[system->root[var]] < 0)
    return;
  double given = hl_system_value (system, var);
  if (fabs (*value - given) <= 1e-8 * fabs (given))
    *value = given;
}

void
hl_results_states (HlSolution *solution)
{
  const HlModel *model = solution->model;
  const HlSystem *system = model->system;
  const gboolean *is_known = solution->numbers.is_known;
  solution->circuits = hl_circuits (model);
  g_autofree gboolean *is_service = hl_circuits_service (model, solution->circuits);
  solution->states = g_new0 (HlNodeResult, model->nodes->len + 1);
  for (guint k = 0; k < model->nodes->len; k++)
    {
      const HlNode *node = hl_model_node (model, (int) k);
      HlNodeResult *result = &solution->states[k];
      result->is_service = is_service[k];
      result->has_flow = is_known[system->root[node->m]];
      result->m = hl_system_value (system, node->m);
      result->has_pressure = is_known[system->root[node->p]];
      result->p = hl_system_value (system, node->p);
      if (!result->has_pressure || !is_known[system->root[node->h]])
        continue;
      /* A liquid that is saturated by its equation is so on paper too, whichever way the last digit rounds. */
      double h = hl_system_value (system, node->h);
      HlSaturation sat;
      if (node->subcooling >= 0 && hl_fluid_saturation_p (node->fluid, result->p, &sat) == HL_OK
          && fabs (h - sat.h_liquid) <= 1e-9 * (sat.h_vapour - sat.h_liquid))
        result->has_state = hl_fluid_state_px (node->fluid, result->p, 0.0, &result->st) == HL_OK;
      else
        result->has_state = hl_fluid_state_ph (node->fluid, result->p, h, &result->st) == HL_OK;
      put_in (system, node->T, &result->st.T);
      put_in (system, node->s, &result->st.s);
      put_in (system, node->v, &result->st.v);
      put_in (system, node->x, &result->st.x);
    }
}

static void
add_result (HlSolution *solution, const HlQuantityKind *kind, double value)
{
  HlPlantResult result = { kind, value };
  g_array_append_val (solution->results, result);
}

/* Nodes with the lowest and highest temperature of the working fluid: what carries the turbines. */
gboolean
hl_results_extremes (const HlSolution *solution, int *lowest, int *highest)
{
  const HlModel *model = solution->model;
  double low = INFINITY, high = 0.0;
  g_autofree gboolean *is_working = g_new0 (gboolean, model->nodes->len + 1);
  for (guint c = 0; c < hl_plant_n_components (model->plant); c++)
    if (hl_plant_component (model->plant, c)->kind->shaft == HL_SHAFT_DRIVES)
      for (int k = model->first_port[c]; k < model->first_port[c + 1]; k++)
        is_working[solution->circuits[g_array_index (model->ports, HlPortNode, k).node]] = TRUE;
  for (guint k = 0; k < model->nodes->len; k++)
    {
      const HlNodeResult *node = &solution->states[k];
      if (!node->has_state || !is_working[solution->circuits[k]])
        continue;
      /* What comes from outside the cycle, make-up above all, is not its lower end. */
      const HlNode *n = hl_model_node (model, (int) k);
      const char *kind = n->component >= 0 ? hl_plant_component (model->plant, (guint) n->component)->kind->id : "";
      if (g_str_equal (kind, "make_up") || g_str_equal (kind, "boundary") || g_str_equal (kind, "steam_user"))
        continue;
      if (node->st.T < low)
        *lowest = (int) k;
      if (node->st.T > high)
        *highest = (int) k;
      low = fmin (low, node->st.T);
      high = fmax (high, node->st.T);
    }
  return high > low;
}

static gboolean
carnot (const HlSolution *solution, double *value)
{
  int lowest, highest;
  if (!hl_results_extremes (solution, &lowest, &highest))
    return FALSE;
  *value = 1.0 - solution->states[lowest].st.T / solution->states[highest].st.T;
  return TRUE;
}

static gboolean
worst_moisture (const HlSolution *solution, double *value)
{
  const HlModel *model = solution->model;
  gboolean found = FALSE;
  *value = 0.0;
  for (guint c = 0; c < hl_plant_n_components (model->plant); c++)
    {
      int var = hl_model_own_var (model, (int) c, "exhaust_moisture");
      if (var < 0 || !solution->numbers.is_known[model->system->root[var]])
        continue;
      *value = fmax (*value, hl_system_value (model->system, var));
      found = TRUE;
    }
  return found;
}

void
hl_results_plant (HlSolution *solution)
{
  const HlModel *model = solution->model;
  guint n;
  const HlQuantityKind *kinds = hl_plant_quantities (&n);
  solution->results = g_array_new (FALSE, FALSE, sizeof (HlPlantResult));
  for (guint k = 0; k < n; k++)
    {
      double value;
      int var = hl_model_own_var (model, -1, kinds[k].key);
      if (var >= 0)
        {
          if (solution->numbers.is_known[model->system->root[var]])
            add_result (solution, &kinds[k], hl_system_value (model->system, var));
        }
      else if (g_str_equal (kinds[k].key, "carnot_efficiency") ? carnot (solution, &value)
               : g_str_equal (kinds[k].key, "exhaust_moisture") ? worst_moisture (solution, &value)
               : hl_exergy_value (solution, -1, kinds[k].key, &value))
        add_result (solution, &kinds[k], value);
    }
}

void
hl_results_processes (HlSolution *solution)
{
  solution->processes = g_array_new (FALSE, FALSE, sizeof (HlProcess));
  HlProcessSink sink = { solution->model, solution->states, NULL, 0, solution->processes, solution->numbers.is_known };
  for (guint c = 0; c < hl_plant_n_components (solution->plant); c++)
    {
      sink.component = hl_plant_component (solution->plant, c);
      sink.index = (int) c;
      const HlComponentModel *model = hl_component_model (sink.component->kind);
      if (model != NULL && model->processes != NULL)
        model->processes (&sink);
    }
}
