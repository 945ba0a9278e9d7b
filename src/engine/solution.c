/* The outcome of a solve: what others read from it.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "engine/solution-private.h"
#include "plant/i18n.h"
#include <math.h>
#include <string.h>

HlSolution *
hl_solution_ref (HlSolution *solution)
{
  g_return_val_if_fail (solution != NULL, NULL);
  g_atomic_ref_count_inc (&solution->ref_count);
  return solution;
}

void
hl_solution_unref (HlSolution *solution)
{
  if (solution == NULL || !g_atomic_ref_count_dec (&solution->ref_count))
    return;
  hl_model_free (solution->model);
  hl_structure_free (solution->structure);
  g_free (solution->numbers.is_known);
  g_free (solution->states);
  g_free (solution->circuits);
  g_array_unref (solution->processes);
  g_array_unref (solution->results);
  hl_exergy_free (solution->exergy);
  hl_findings_clear (&solution->findings);
  hl_findings_clear (&solution->dismissed);
  hl_plant_unref (solution->plant);
  g_free (solution);
}

HlPlant *
hl_solution_plant (const HlSolution *solution)
{
  g_return_val_if_fail (solution != NULL, NULL);
  return solution->plant;
}

gboolean
hl_solution_is_solved (const HlSolution *solution)
{
  g_return_val_if_fail (solution != NULL, FALSE);
  return solution->is_complete && !hl_findings_have (&solution->findings, HL_GRADE_ERROR);
}

/* Findings that only say that the drawing is not done. */
static gboolean
is_unfinished (const HlFinding *finding)
{
  return g_str_equal (finding->code, "open-port") || g_str_equal (finding->code, "missing-value");
}

gboolean
hl_solution_is_partial (const HlSolution *solution)
{
  g_return_val_if_fail (solution != NULL, FALSE);
  if (solution->is_complete || solution->numbers.failed != HL_FAILED_NOT || solution->structure->n_over > 0)
    return FALSE;
  for (guint k = 0; k < solution->findings.list->len; k++)
    {
      const HlFinding *finding = &g_array_index (solution->findings.list, HlFinding, k);
      if (finding->grade == HL_GRADE_ERROR && !is_unfinished (finding))
        return FALSE;
    }
  for (guint n = 0; n < hl_plant_n_streams (solution->plant); n++)
    if (solution->states[n].has_flow && solution->states[n].has_state)
      return TRUE;
  return FALSE;
}

double
hl_solution_seconds (const HlSolution *solution)
{
  return solution->seconds;
}

void
hl_solution_stream (const HlSolution *solution, guint stream, HlStreamResult *result)
{
  memset (result, 0, sizeof *result);
  g_return_if_fail (solution != NULL && stream < hl_plant_n_streams (solution->plant));
  const HlNodeResult *node = &solution->states[stream];
  *result = (HlStreamResult) { node->has_flow, node->has_state, node->m, node->st, hl_model_node (solution->model, (int) stream)->fluid, NAN };
  if (node->has_state && !hl_exergy_of_state (solution, result->fluid, &node->st, &result->e))
    result->e = NAN;
}

static gboolean
state_value (const HlSolution *solution, int n, char letter, double *value)
{
  const HlNodeResult *node = &solution->states[n];
  switch (letter)
    {
    case 'm': *value = node->m; return node->has_flow;
    case 'p': *value = node->p; return node->has_pressure;
    case 'T': *value = node->st.T; return node->has_state;
    case 'h': *value = node->st.h; return node->has_state;
    case 's': *value = node->st.s; return node->has_state;
    case 'v': *value = node->st.v; return node->has_state;
    case 'x': *value = node->st.x; return node->has_state && !isnan (node->st.x);
    case 'e': return node->has_state && hl_exergy_of_state (solution, hl_model_node (solution->model, n)->fluid, &node->st, value);
    default: return FALSE;
    }
}

gboolean
hl_solution_value (const HlSolution *solution, const HlAddress *address, double *value)
{
  int node, var;
  char letter;
  double found;
  g_return_val_if_fail (solution != NULL && address != NULL && value != NULL, FALSE);
  if (hl_model_find_state (solution->model, address, &node, &letter))
    {
      if (!state_value (solution, node, letter, &found))
        return FALSE;
      *value = found;
      return TRUE;
    }
  var = hl_model_find_var (solution->model, address);
  if (var >= 0)
    {
      if (!solution->numbers.is_known[solution->model->system->root[var]])
        return FALSE;
      *value = hl_system_value (solution->model->system, var);
      return TRUE;
    }
  for (guint k = 0; address->owner == HL_OWNER_PLANT && k < solution->results->len; k++)
    {
      const HlPlantResult *result = &g_array_index (solution->results, HlPlantResult, k);
      if (g_str_equal (result->kind->key, address->key))
        {
          *value = result->value;
          return TRUE;
        }
    }
  if (address->owner == HL_OWNER_COMPONENT && g_str_has_prefix (address->key, "exergy_"))
    {
      int component = hl_plant_component_index (solution->plant, address->id);
      return component >= 0 && hl_exergy_value (solution, component, address->key, value);
    }
  /* What nothing is calculated from, such as an efficiency that the groups override, is as it was put in. */
  const HlValue *typed = hl_plant_value (solution->plant, address);
  if (typed == NULL || typed->origin == HL_ORIGIN_TIED)
    return FALSE;
  *value = typed->value;
  return TRUE;
}

guint
hl_solution_n_results (const HlSolution *solution)
{
  return solution->results->len;
}

const HlQuantityKind *
hl_solution_result (const HlSolution *solution, guint n, double *value)
{
  g_return_val_if_fail (n < solution->results->len, NULL);
  const HlPlantResult *result = &g_array_index (solution->results, HlPlantResult, n);
  if (value != NULL)
    *value = result->value;
  return result->kind;
}

guint
hl_solution_n_processes (const HlSolution *solution)
{
  return solution->processes->len;
}

const HlProcess *
hl_solution_process (const HlSolution *solution, guint n)
{
  g_return_val_if_fail (n < solution->processes->len, NULL);
  return &g_array_index (solution->processes, HlProcess, n);
}

guint
hl_solution_n_findings (const HlSolution *solution)
{
  return solution->findings.list->len;
}

const HlFinding *
hl_solution_finding (const HlSolution *solution, guint n)
{
  g_return_val_if_fail (n < solution->findings.list->len, NULL);
  return &g_array_index (solution->findings.list, HlFinding, n);
}

guint
hl_solution_n_dismissed (const HlSolution *solution)
{
  return solution->dismissed.list->len;
}

const HlFinding *
hl_solution_dismissed (const HlSolution *solution, guint n)
{
  g_return_val_if_fail (n < solution->dismissed.list->len, NULL);
  return &g_array_index (solution->dismissed.list, HlFinding, n);
}

gboolean
hl_solution_has_grade (const HlSolution *solution, HlGrade at_least)
{
  return hl_findings_have (&solution->findings, at_least);
}

gboolean
hl_solution_exergy (const HlSolution *solution, guint component, HlExergyBalance *balance)
{
  g_return_val_if_fail (solution != NULL && component < hl_plant_n_components (solution->plant) && balance != NULL, FALSE);
  const HlExergyResult *result = &solution->exergy->results[component];
  if (!result->is_known)
    return FALSE;
  *balance = (HlExergyBalance) { result->fuel, result->product, result->loss, result->destruction, result->efficiency,
                                 result->words != NULL ? _(result->words) : "" };
  return TRUE;
}

guint
hl_solution_n_exergy_flows (const HlSolution *solution)
{
  return solution->exergy->flows->len;
}

const HlExergyFlow *
hl_solution_exergy_flow (const HlSolution *solution, guint n)
{
  g_return_val_if_fail (n < solution->exergy->flows->len, NULL);
  return &g_array_index (solution->exergy->flows, HlExergyFlow, n);
}

void
hl_solution_effort (const HlSolution *solution, HlSolveEffort *effort)
{
  *effort = solution->effort;
}

static gboolean
plant_value (const HlSolution *solution, const char *key, double *value)
{
  HlAddress address = hl_address_plant (g_intern_static_string (key));
  return hl_solution_value (solution, &address, value);
}

/* Power first, then the efficiency that says most, then what is still assumed. */
char *
hl_solution_summary (const HlSolution *solution)
{
  g_return_val_if_fail (solution != NULL, NULL);
  HlUnitSet units = hl_plant_units (solution->plant);
  double value;
  if (hl_plant_n_components (solution->plant) == 0)
    return g_strdup (_("Nothing drawn yet: drag a component from the shelf"));
  if (!hl_solution_is_solved (solution))
    return g_strdup (solution->findings.list->len > 0 ? g_array_index (solution->findings.list, HlFinding, 0).text : _("Not solved"));
  GString *text = g_string_new (_("Solved"));
  if (plant_value (solution, "net_power", &value))
    {
      g_autofree char *power = hl_units_format (value, HL_DIMENSION_POWER, units);
      g_string_append_printf (text, _(" · %s net"), power);
    }
  if (plant_value (solution, "net_efficiency_lhv", &value))
    g_string_append_printf (text, " · %.2f %%", 100.0 * value);
  if (plant_value (solution, "cop", &value) || plant_value (solution, "cop_cooling", &value))
    g_string_append_printf (text, _(" · COP %.2f"), value);
  guint n = hl_plant_n_assumed (solution->plant);
  if (n > 0)
    g_string_append_printf (text, ngettext_hl (" · %u value assumed", " · %u values assumed", n), n);
  return g_string_free (text, FALSE);
}
