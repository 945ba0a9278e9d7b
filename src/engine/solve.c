/* The way in: plant to equations, structure, numbers, results, findings.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "engine/engine.h"
#include "engine/checks.h"
#include "engine/diagnose.h"
#include "engine/solution-private.h"
#include "engine/usual.h"
#include <math.h>

#define N_VARIANTS 4        /* starts from usual values, each a little different */

/* Takes over the values of an earlier solution where an unknown has the same address. */
static void
start_from (HlSystem *system, const HlSolution *start)
{
  if (start == NULL || start->model == NULL || start->numbers.is_known == NULL)
    return;
  const HlSystem *old = start->model->system;
  g_autoptr (GHashTable) by_address = NULL;
  for (guint i = 0; i < system->vars->len; i++)
    {
      const HlVar *var = hl_system_var (system, i);
      if (system->root[i] != (int) i || system->fixed_by[i] >= 0 || var->address.key[0] == '\0')
        continue;
      int at = -1;
      if (i < old->vars->len && hl_address_equal (&hl_system_var (old, i)->address, &var->address))
        at = (int) i;
      else
        {
          if (by_address == NULL)
            {
              by_address = g_hash_table_new_full (g_str_hash, g_str_equal, g_free, NULL);
              for (guint k = 0; k < old->vars->len; k++)
                {
                  const HlAddress *a = &hl_system_var (old, k)->address;
                  g_hash_table_insert (by_address, g_strdup_printf ("%d %s %s", a->owner, a->id, a->key), GINT_TO_POINTER (k + 1));
                }
            }
          g_autofree char *key = g_strdup_printf ("%d %s %s", var->address.owner, var->address.id, var->address.key);
          at = GPOINTER_TO_INT (g_hash_table_lookup (by_address, key)) - 1;
        }
      if (at >= 0 && start->numbers.is_known[old->root[at]] && hl_system_var (old, at)->kind == var->kind)
        system->x[i] = old->x[old->root[at]];
    }
}

static double
seconds_since (gint64 start)
{
  return (double) (g_get_monotonic_time () - start) * 1e-6;
}

static void
check (HlSolution *solution)
{
  HlChecker checker = { .model = solution->model, .states = solution->states, .is_known = solution->numbers.is_known,
                        .is_complete = solution->is_complete, .findings = &solution->findings,
                        .exergy = solution->exergy };
  hl_check_all (&checker);
}

static void
fill_effort (HlSolution *solution)
{
  const HlStructure *s = solution->structure;
  solution->effort.n_unknowns = (guint) (s->n_solved + s->n_open + s->n_last);
  solution->effort.n_blocks = (guint) s->n_blocks;
  solution->effort.largest_block = (guint) s->largest;
  solution->effort.n_iterations = (guint) solution->numbers.n_iterations;
}

/* A temperature taken to set a pressure says too much where the pressure follows from something else: then it sets the
 * enthalpy. */
static void
reconsider_saturation (HlPlant *plant, HlModel **model, HlStructure **structure)
{
  guint n = (*model)->nodes->len;
  g_autofree gboolean *other = g_new0 (gboolean, n + 1);
  gboolean any = FALSE;
  for (guint k = 0; k < n; k++)
    any |= other[k] = hl_model_node (*model, (int) k)->T_is_saturation && hl_model_node (*model, (int) k)->is_exhaust;
  if (!any)
    return;
  HlModel *second = hl_model_new_other (plant, other, n);
  HlStructure *of_second = hl_structure_new (second->system);
  if (of_second->n_over < (*structure)->n_over)
    {
      HlModel *first = *model;
      HlStructure *of_first = *structure;
      *model = second;
      *structure = of_second;
      second = first;
      of_second = of_first;
    }
  hl_model_free (second);
  hl_structure_free (of_second);
}

void
hl_solve_prepare (HlPlant *plant, const gboolean *other, guint n_other, HlModel **model, HlStructure **structure, HlSolveEffort *effort)
{
  gint64 phase = g_get_monotonic_time ();
  *model = hl_model_new_other (plant, other, n_other);
  effort->seconds_build += seconds_since (phase);
  phase = g_get_monotonic_time ();
  *structure = hl_structure_new ((*model)->system);
  effort->seconds_structure += seconds_since (phase);
  if ((*structure)->n_over > 0 && other == NULL)
    reconsider_saturation (plant, model, structure);
}

gboolean
hl_solve_can_reuse (const HlSolution *start, HlPlant *plant)
{
  return start != NULL && start->is_complete && start->structure->is_sound && hl_model_fits (start->model, plant);
}

/* Plant to unknowns, and numbers for them. */
static void
try_solve (HlSolution *solution, const HlSolution *start, HlPatience patience, const gboolean *other, guint n_other)
{
  gint64 phase = g_get_monotonic_time ();
  gboolean reuses = other == NULL && patience == HL_PATIENCE_USUAL && hl_solve_can_reuse (start, solution->plant), may_try = TRUE;
  hl_findings_init (&solution->findings);
  if (reuses)
    {
      solution->model = hl_model_with_values (start->model, solution->plant);
      solution->structure = hl_structure_ref (start->structure);
      solution->effort.seconds_build += seconds_since (phase);
    }
  else
    hl_solve_prepare (solution->plant, other, n_other, &solution->model, &solution->structure, &solution->effort);
  phase = g_get_monotonic_time ();
  if (!reuses)
    {
      may_try = hl_diagnose_structure (solution->model, solution->structure, &solution->findings);
      solution->structure->is_sound = may_try && solution->findings.list->len == 0 && solution->structure->n_missing == 0;
    }
  solution->effort.seconds_structure += seconds_since (phase);

  phase = g_get_monotonic_time ();
  if (!reuses)
    start_from (solution->model->system, start);
  if (may_try)
    {
      HlUsualSource source = { solution->model, solution->structure };
      HlUsual usual = hl_usual (&source);
      usual.first = patience >= HL_PATIENCE_USUAL_FIRST;
      usual.variant = MAX ((int) patience - (int) HL_PATIENCE_USUAL_FIRST, 0);
      hl_numbers_solve (solution->model->system, solution->structure, patience == HL_PATIENCE_NONE ? NULL : &usual, &solution->numbers);
    }
  else
    hl_numbers_skip (solution->model->system, &solution->numbers);
  solution->is_complete = may_try && solution->numbers.failed == HL_FAILED_NOT && solution->structure->n_missing == 0;
  solution->effort.seconds_numbers += seconds_since (phase);
}

static void
forget_try (HlSolution *solution)
{
  g_clear_pointer (&solution->model, hl_model_free);
  g_clear_pointer (&solution->structure, hl_structure_free);
  g_clear_pointer (&solution->numbers.is_known, g_free);
  hl_findings_clear (&solution->findings);
}

typedef enum { FORMS_HOLD, FORMS_MAY_BE_WRONG, FORMS_ARE_WRONG } Forms;

static gboolean
leaves_turbine (const HlModel *model, const HlNode *node)
{
  return node->component >= 0 && hl_plant_component (model->plant, (guint) node->component)->kind->shaft == HL_SHAFT_DRIVES
         && !g_str_equal (node->port, "inlet");
}

/* Was a temperature which set a pressure that of wet steam?  Marks where not: that answer is none.  After a failure marks
 * where steam from a turbine was taken for dry: it may have been wet. */
static Forms
look_at_forms (const HlSolution *solution, gboolean *other)
{
  const HlModel *model = solution->model;
  const HlSystem *system = model->system;
  gboolean failed = solution->numbers.failed != HL_FAILED_NOT;
  Forms forms = FORMS_HOLD;
  for (guint k = 0; k < model->nodes->len; k++)
    {
      const HlNode *node = hl_model_node (model, (int) k);
      HlSaturation sat;
      other[k] = FALSE;
      if (!node->T_is_free)
        continue;
      if (!node->T_is_saturation)
        {
          other[k] = failed && leaves_turbine (model, node);
          forms = MAX (forms, other[k] ? FORMS_MAY_BE_WRONG : FORMS_HOLD);
        }
      else if (solution->numbers.is_known[system->root[node->h]] && solution->numbers.is_known[system->root[node->p]]
               && hl_fluid_saturation_p (node->fluid, hl_system_value (system, node->p), &sat) == HL_OK)
        {
          double h = hl_system_value (system, node->h), slack = 1e-7 * (sat.h_vapour - sat.h_liquid);
          other[k] = h > sat.h_vapour + slack || h < sat.h_liquid - slack;
          forms = MAX (forms, other[k] ? FORMS_ARE_WRONG : FORMS_HOLD);
        }
    }
  return forms;
}

/* Tries the other form where a temperature may have been taken for the wrong one. */
static void
reconsider (HlSolution *solution, const HlSolution *start, HlPatience patience)
{
  guint n = solution->model->nodes->len;
  g_autofree gboolean *other = g_new0 (gboolean, n + 1), *again = g_new0 (gboolean, n + 1);
  Forms forms = look_at_forms (solution, other);
  if (forms == FORMS_HOLD)
    return;
  HlSolution second = *solution;
  try_solve (&second, start, patience, other, n);
  gboolean is_good = second.is_complete && look_at_forms (&second, again) == FORMS_HOLD;
  if (is_good || forms == FORMS_ARE_WRONG)
    {
      HlSolution keep = *solution;
      *solution = second;
      second = keep;
    }
  forget_try (&second);
}

/* What follows from the numbers, and whether it can be. */
static void
finish (HlSolution *solution)
{
  gint64 phase = g_get_monotonic_time ();
  hl_results_states (solution);
  hl_exergy_solve (solution);
  hl_results_plant (solution);
  hl_results_processes (solution);
  guint before = solution->findings.list->len;
  check (solution);
  /* A law that is broken already where values were put in says more than a solver that found no way. */
  gboolean explained = FALSE;
  for (guint k = before; k < solution->findings.list->len; k++)
    explained |= g_array_index (solution->findings.list, HlFinding, k).grade == HL_GRADE_ERROR;
  if (!explained)
    hl_diagnose_numbers (solution->model, solution->structure, &solution->numbers, &solution->findings);
  hl_findings_sort (&solution->findings);
  hl_findings_set_aside (&solution->findings, solution->plant, &solution->dismissed);
  fill_effort (solution);
  solution->effort.seconds_results = seconds_since (phase);
}

HlSolution *
hl_solve_once (HlPlant *plant, const HlSolution *start, HlPatience patience)
{
  HlSolution *solution = g_new0 (HlSolution, 1);
  gint64 begin = g_get_monotonic_time ();
  g_atomic_ref_count_init (&solution->ref_count);
  solution->plant = hl_plant_ref (plant);
  try_solve (solution, start, patience, NULL, 0);
  if (solution->structure->n_over == 0)
    reconsider (solution, start, patience);
  finish (solution);
  solution->seconds = seconds_since (begin);
  return solution;
}

/* Several unknowns at once may have more than one answer: another start may lead to a better one, or to one at all. */
static gboolean
may_have_another (const HlSolution *solution)
{
  const HlStructure *s = solution->structure;
  return !hl_solution_is_solved (solution) && s->n_over == 0 && s->n_missing == 0 && s->largest > 1 && solution->model->open_ports->len == 0;
}

/* Takes the better of the two, at equal merit the first; the other goes. */
static HlSolution *
better (HlSolution *first, HlSolution *second)
{
  gboolean take = hl_solution_is_solved (second) || (second->is_complete && !first->is_complete);
  double seconds = first->seconds + second->seconds;
  HlSolution *taken = take ? second : first;
  hl_solution_unref (take ? first : second);
  taken->seconds = seconds;
  return taken;
}

/* The plant without heat losses, which tie all states of an expansion to its flow; NULL where it has none. */
static HlPlant *
without_losses (HlPlant *plant)
{
  const char *key = g_intern_static_string ("heat_loss");
  HlPlant *easier = NULL;
  for (guint n = 0; n < hl_plant_n_components (plant); n++)
    {
      const HlComponent *component = hl_plant_component (plant, n);
      const HlValue *value = hl_values_find (&component->values, key);
      if (value == NULL || value->origin == HL_ORIGIN_TIED || fabs (value->value) < G_MINDOUBLE)
        continue;
      HlAddress address = hl_address_component (component->id, key);
      HlValue none = { .origin = value->origin, .value = 0.0 };
      HlPlant *next = hl_plant_with_value (easier != NULL ? easier : plant, &address, &none, NULL);
      if (next == NULL)
        continue;
      g_clear_pointer (&easier, hl_plant_unref);
      easier = next;
    }
  return easier;
}

static HlSolution *
solve_by_easier_plant (HlPlant *plant)
{
  g_autoptr (HlPlant) easier = without_losses (plant);
  if (easier == NULL)
    return NULL;
  g_autoptr (HlSolution) first = hl_solve_once (easier, NULL, HL_PATIENCE_USUAL);
  return first->is_complete ? hl_solve_once (plant, first, HL_PATIENCE_NONE) : NULL;
}

HlSolution *
hl_solve (HlPlant *plant, const HlSolution *start)
{
  g_return_val_if_fail (plant != NULL, NULL);
  HlSolution *solution = hl_solve_once (plant, start, HL_PATIENCE_USUAL);
  if (start != NULL && may_have_another (solution))
    solution = better (solution, hl_solve_once (plant, NULL, HL_PATIENCE_USUAL));
  HlSolution *led = may_have_another (solution) ? solve_by_easier_plant (plant) : NULL;
  if (led != NULL)
    solution = better (solution, led);
  for (int variant = 0; variant < N_VARIANTS && may_have_another (solution); variant++)
    solution = better (solution, hl_solve_once (plant, NULL, HL_PATIENCE_USUAL_FIRST + variant));
  return solution;
}
