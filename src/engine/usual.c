/* What is usual: values that a kind's table knows, pressures between their neighbours along an expansion.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "engine/usual.h"
#include "engine/numbers-private.h"
#include <math.h>
#include <string.h>

#define CONDENSER_P 7e3      /* [Pa] */

typedef struct {
  const HlModel  *model;
  const gboolean *is_known;
  double         *usual;
} Tell;

static double
known_p (const Tell *t, int var)
{
  int root = t->model->system->root[var];
  if (t->is_known[root])
    return t->model->system->x[root];
  return t->usual[root];
}

/* Pressures along a turbine: unknown ones between those known before and behind them, evenly in the logarithm. */
static void
tell_expansion (Tell *t, int c)
{
  const HlComponent *component = hl_plant_component (t->model->plant, (guint) c);
  int n_extractions = hl_component_option (component, "extractions"), n = 0, p[64];
  for (int k = 0; k <= n_extractions + 1 && n < 64; k++)
    {
      int node = hl_model_port_node (t->model, c, k == 0 ? "inlet" : k <= n_extractions ? hl_key ("extraction", k) : "exhaust");
      if (node >= 0 && hl_model_node (t->model, node)->fluid != hl_fluid_water ())
        return;
      if (node >= 0)
        p[n++] = hl_model_node (t->model, node)->p;
    }
  int exhaust = hl_model_port_node (t->model, c, "exhaust");
  /* Steam on its way to be condensed is at a condenser's pressure. */
  if (exhaust >= 0 && hl_model_node (t->model, exhaust)->is_exhaust && !isfinite (known_p (t, hl_model_node (t->model, exhaust)->p)))
    t->usual[t->model->system->root[hl_model_node (t->model, exhaust)->p]] = log (CONDENSER_P);
  for (int first = 0; first < n;)
    {
      int last = first;
      double above = first > 0 ? known_p (t, p[first - 1]) : NAN;
      if (isfinite (known_p (t, p[first])))
        {
          first++;
          continue;
        }
      while (last + 1 < n && !isfinite (known_p (t, p[last + 1])))
        last++;
      double below = last + 1 < n ? known_p (t, p[last + 1]) : NAN;
      int count = last - first + 1;
      if (isnan (above) && isnan (below))
        {
          above = log (100e5);
          below = log (CONDENSER_P);
        }
      else if (isnan (above))
        above = below + 1.2 * (count + 1);
      else if (isnan (below))
        below = fmax (above - 1.2 * (count + 1), fmin (log (CONDENSER_P), above - 0.1));
      for (int k = first; k <= last; k++)
        t->usual[t->model->system->root[p[k]]] = above + (below - above) * (k - first + 1) / (count + 1);
      first = last + 1;
    }
}

static void
tell_own (Tell *t, int c)
{
  const HlModel *model = t->model;
  const HlComponent *component = hl_plant_component (model->plant, (guint) c);
  for (guint k = 0; k < hl_component_n_quantities (component); k++)
    {
      HlQuantity quantity = hl_component_quantity (component, k);
      double value = hl_quantity_default (quantity.kind, quantity.number);
      if (!isfinite (value) || !(quantity.kind->flags & (HL_QUANTITY_ASSUMED | HL_QUANTITY_USUAL)) || quantity.kind->flags & HL_QUANTITY_RESULT)
        continue;
      HlAddress address = hl_address_component (component->id, quantity.key);
      int var = hl_model_find_var (model, &address);
      if (var < 0)
        continue;
      HlVarKind kind = hl_system_var (model->system, var)->kind;
      int root = model->system->root[var];
      const HlVar *of_state = hl_system_var (model->system, var);
      double x = hl_var_from_si (kind, value);
      /* States that the tables call usual are water's. */
      if (kind == HL_VAR_FLOW || kind == HL_VAR_POWER || t->is_known[root] || isfinite (t->usual[root]) || !hl_numbers_inside (of_state, x)
          || (of_state->scale != NULL && of_state->scale != hl_fluid_scale (hl_fluid_water ())))
        continue;
      t->usual[root] = x;
    }
}

/* An equation that lacks one usual value tells it. */
static void
tell_from (Tell *t, int equation)
{
  HlSystem *system = t->model->system;
  const HlEquation *e = hl_system_equation (system, equation);
  const int *vars = hl_equation_vars (system, e);
  HlNumbers effort = { 0 };
  int at = -1;
  for (int i = 0; i < e->n; i++)
    {
      gboolean open = !t->is_known[vars[i]] && !isfinite (t->usual[vars[i]]);
      if (open && at >= 0 && vars[i] != vars[at])
        return;
      if (open)
        at = i;
    }
  if (at < 0)
    return;
  for (int i = 0; i < e->n; i++)
    if (isfinite (t->usual[vars[i]]))
      system->x[vars[i]] = t->usual[vars[i]];
  if (hl_scalar_solve (system, equation, vars[at], &effort) == HL_FAILED_NOT && isfinite (system->x[vars[at]]))
    t->usual[vars[at]] = system->x[vars[at]];
}

/* What follows from the block in question, and has a usual value, tells what the block's unknowns usually are. */
static void
tell_backwards (Tell *t, const HlStructure *structure)
{
  HlSystem *system = t->model->system;
  g_autofree double *keep = g_memdup2 (system->x, sizeof (double) * MAX (system->vars->len, 1));
  for (int k = structure->n_last - 1; k >= 0; k--)
    tell_from (t, structure->last[k]);
  for (int b = structure->n_blocks - 1; b >= 0; b--)
    if (structure->start[b + 1] - structure->start[b] == 1)
      tell_from (t, structure->equations[structure->start[b]]);
  memcpy (system->x, keep, sizeof (double) * system->vars->len);
}

/* A value that an engineer seldom has at hand: a state of a stream, a result, a size. */
static gboolean
is_unusual (const HlModel *model, const HlSpec *spec)
{
  if (spec->origin != HL_ORIGIN_GIVEN || spec->address.key[0] == '\0')
    return FALSE;
  const HlQuantityKind *kind = hl_plant_quantity_kind (model->plant, &spec->address);
  if (kind == NULL || spec->address.owner == HL_OWNER_STREAM)
    return kind != NULL;
  return !(kind->flags & (HL_QUANTITY_ASSUMED | HL_QUANTITY_USUAL));
}

/* Something must say how large the plant is: where only unusual values do, the one that says most counts as usual. */
static void
keep_size (const HlModel *model, gboolean *unusual)
{
  int best = -1;
  double most = 0.0;
  for (guint k = 0; k < model->system->specs->len; k++)
    {
      const HlSpec *spec = hl_system_spec (model->system, k);
      HlVarKind kind = hl_system_var (model->system, spec->var)->kind;
      if ((kind != HL_VAR_FLOW && kind != HL_VAR_POWER) || spec->origin == HL_ORIGIN_TIED || !(fabs (spec->value) > 0.0))
        continue;
      if (!unusual[model->system->root[spec->var]])
        return;
      double says = fabs (spec->value) / hl_system_scale (model->system, kind);
      if (says > most)
        {
          most = says;
          best = model->system->root[spec->var];
        }
    }
  if (best >= 0)
    unusual[best] = FALSE;
}

/* What was computed from an unusual value is one, too. */
static void
pass_on (const HlModel *model, const HlStructure *structure, const gboolean *is_known, gboolean *unusual)
{
  for (int b = 0; b < structure->n_blocks; b++)
    {
      int first = structure->start[b], end = structure->start[b + 1];
      gboolean odd = FALSE;
      if (!is_known[structure->vars[first]])
        continue;
      for (int k = first; k < end && !odd; k++)
        {
          const HlEquation *e = hl_system_equation (model->system, structure->equations[k]);
          const int *vars = hl_equation_vars (model->system, e);
          for (int i = 0; i < e->n; i++)
            odd |= unusual[vars[i]];
        }
      for (int k = first; k < end; k++)
        unusual[structure->vars[k]] |= odd;
    }
}

static void
tell (gpointer data, const gboolean *is_known, double *usual, gboolean *unusual)
{
  const HlUsualSource *source = data;
  const HlModel *model = source->model;
  Tell t = { model, is_known, usual };
  int n = (int) hl_plant_n_components (model->plant);
  /* Pressures along expansions first: a table's value for an extraction fits no particular plant. */
  for (int c = 0; c < n; c++)
    if (g_str_equal (hl_plant_component (model->plant, (guint) c)->kind->id, "turbine"))
      tell_expansion (&t, c);
  for (int c = 0; c < n; c++)
    tell_own (&t, c);
  tell_backwards (&t, source->structure);
  for (guint k = 0; k < model->system->specs->len; k++)
    {
      const HlSpec *spec = hl_system_spec (model->system, k);
      unusual[model->system->root[spec->var]] |= is_unusual (model, spec);
    }
  keep_size (model, unusual);
  pass_on (model, source->structure, is_known, unusual);
}

HlUsual
hl_usual (HlUsualSource *source)
{
  return (HlUsual) { .data = source, .tell = tell };
}
