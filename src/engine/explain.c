/* How a found value came about: its equation in words and in numbers, and where each input comes from.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "engine/solution-private.h"
#include "engine/names.h"
#include "plant/i18n.h"
#include <math.h>
#include <string.h>

/* The equation that gave a variable its value: the one that computes it, else the one matched to it in the order of solving. */
static int
equation_of (const HlSolution *solution, int root, int *block)
{
  const HlStructure *s = solution->structure;
  HlSystem *system = solution->model->system;
  *block = -1;
  for (int k = 0; k < s->n_last; k++)
    {
      const HlEquation *e = hl_system_equation (system, s->last[k]);
      if (hl_equation_vars (system, e)[e->output] == root)
        return s->last[k];
    }
  for (int k = 0; k < s->n_blocks; k++)
    for (int i = s->start[k]; i < s->start[k + 1]; i++)
      if (s->vars[i] == root)
        {
          *block = k;
          for (int j = s->start[k]; j < s->start[k + 1]; j++)
            {
              const HlEquation *e = hl_system_equation (system, s->equations[j]);
              if (e->output >= 0 && hl_equation_vars (system, e)[e->output] == root)
                return s->equations[j];
            }
          return s->equations[i];
        }
  return -1;
}

static char *
origin_of (const HlSolution *solution, int root)
{
  HlSystem *system = solution->model->system;
  for (guint k = 0; k < system->specs->len; k++)
    {
      const HlSpec *spec = hl_system_spec (system, k);
      if (system->root[spec->var] != root || (spec->origin != HL_ORIGIN_TIED && system->fixed_by[root] != (int) k))
        continue;
      if (spec->address.key[0] == '\0')
        return g_strdup (_("constant"));
      const HlValue *value = hl_plant_value (solution->plant, &spec->address);
      if (spec->origin == HL_ORIGIN_TIED && value != NULL)
        {
          g_autofree char *tie = hl_tie_format (solution->plant, &spec->address, value);
          return g_strdup_printf (_("tied: =%s"), tie);
        }
      const HlQuantityKind *kind = hl_plant_quantity_kind (solution->plant, &spec->address);
      if (spec->origin == HL_ORIGIN_ASSUMED && kind != NULL && kind->default_source != NULL)
        return g_strdup_printf (_("assumed; %s"), _(kind->default_source));
      return g_strdup (hl_origin_name (spec->origin));
    }
  return g_strdup (_("found"));
}

static void
write_inputs (const HlSolution *solution, int equation, int root, GString *text)
{
  HlSystem *system = solution->model->system;
  const HlEquation *e = hl_system_equation (system, equation);
  const int *vars = hl_equation_vars (system, e);
  for (int k = 0; k < e->n; k++)
    {
      gboolean seen = vars[k] == root;
      for (int j = 0; j < k && !seen; j++)
        seen = vars[j] == vars[k];
      if (seen)
        continue;
      int raw = g_array_index (system->raw, int, e->first + k);
      g_autofree char *name = hl_name_var (solution->model, raw), *value = hl_name_value (solution->model, raw);
      g_autofree char *origin = origin_of (solution, vars[k]);
      g_string_append_printf (text, "\n  %s = %s  (%s)", name, value, origin);
    }
}

static char *
explain_var (const HlSolution *solution, int var, const HlAddress *address)
{
  const HlModel *model = solution->model;
  int root = model->system->root[var], block;
  if (!solution->numbers.is_known[root])
    return NULL;
  GString *text = g_string_new (NULL);
  g_autofree char *name = hl_plant_describe (solution->plant, address), *value = hl_name_value (model, var);
  g_string_append_printf (text, "%s = %s", name, value);
  int equation = model->system->fixed_by[root] >= 0 ? -1 : equation_of (solution, root, &block);
  if (equation < 0)
    {
      g_autofree char *origin = origin_of (solution, root);
      g_string_append_printf (text, "\n%s", origin);
      return g_string_free (text, FALSE);
    }
  const HlEquation *e = hl_system_equation (model->system, equation);
  g_autofree char *words = hl_name_equation (model, equation, FALSE), *numbers = hl_name_equation (model, equation, TRUE);
  g_string_append_printf (text, "\n%s\n%s", words, numbers);
  write_inputs (solution, equation, root, text);
  if (e->fluid != NULL)
    g_string_append_printf (text, "\n%s: %s", _("Properties"), hl_fluid_formulation (e->fluid));
  int n = block >= 0 ? solution->structure->start[block + 1] - solution->structure->start[block] : 1;
  if (n > 1)
    {
      g_autofree char *where = hl_name_components (model, solution->structure->equations + solution->structure->start[block], n);
      g_string_append_printf (text, _("\nSolved together with %d other quantities of %s."), n - 1, where);
    }
  return g_string_free (text, FALSE);
}

/* A property of a state: from its pressure and enthalpy. */
static char *
explain_state (const HlSolution *solution, int node, char letter, const HlAddress *address)
{
  const HlNode *n = hl_model_node (solution->model, node);
  const HlNodeResult *result = &solution->states[node];
  HlUnitSet units = hl_plant_units (solution->plant);
  double value;
  if (!result->has_state || !hl_solution_value (solution, address, &value))
    return NULL;
  const HlQuantityKind *kind = hl_plant_quantity_kind (solution->plant, address);
  g_autofree char *name = hl_plant_describe (solution->plant, address);
  g_autofree char *shown = hl_units_format (value, kind != NULL ? kind->dimension : HL_DIMENSION_RATIO, units);
  g_autofree char *p = hl_units_format (result->p, HL_DIMENSION_PRESSURE, units), *h = hl_units_format (result->st.h, HL_DIMENSION_ENTHALPY, units);
  g_autofree char *p_name = hl_name_var (solution->model, n->p), *h_name = hl_name_var (solution->model, n->h);
  g_autofree char *p_origin = origin_of (solution, solution->model->system->root[n->p]);
  g_autofree char *h_origin = origin_of (solution, solution->model->system->root[n->h]);
  return g_strdup_printf ("%s = %s\n%c = %c(p, h)\n%s = %c(%s, %s)\n  %s = %s  (%s)\n  %s = %s  (%s)\n%s: %s", name, shown, letter, letter, shown, letter, p, h,
                          p_name, p, p_origin, h_name, h, h_origin, _("Properties"), hl_fluid_formulation (n->fluid));
}

static char *
explain_plant (const HlSolution *solution, const HlAddress *address)
{
  double value;
  if (!hl_solution_value (solution, address, &value))
    return NULL;
  g_autofree char *name = hl_plant_describe (solution->plant, address);
  if (g_str_equal (address->key, "carnot_efficiency"))
    return g_strdup_printf (_("%s = %.2f %%\n1 − T_low ÷ T_high, lowest and highest temperature of the working fluid"), name, 100.0 * value);
  if (g_str_equal (address->key, "exhaust_moisture"))
    return g_strdup_printf (_("%s = %.2f %%\nthe wettest turbine exhaust"), name, 100.0 * value);
  return NULL;
}

char *
hl_solution_explain (const HlSolution *solution, const HlAddress *address)
{
  int node = -1;
  char letter = '\0';
  g_return_val_if_fail (solution != NULL && address != NULL, NULL);
  int var = hl_model_find_var (solution->model, address);
  gboolean is_state = hl_model_find_state (solution->model, address, &node, &letter);
  if (var >= 0 && solution->numbers.is_known[solution->model->system->root[var]])
    return explain_var (solution, var, address);
  if (is_state)
    return explain_state (solution, node, letter, address);
  return address->owner == HL_OWNER_PLANT ? explain_plant (solution, address) : NULL;
}
