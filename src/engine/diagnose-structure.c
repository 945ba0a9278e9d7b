/* Findings from the structure: open ports, missing values, values too many.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "engine/diagnose.h"
#include "engine/components/components.h"
#include "engine/names.h"
#include "plant/i18n.h"
#include <math.h>
#include <stdlib.h>
#include <string.h>

#define MOST_NAMED 3

/* --- open ports and unknown kinds --------------------------------------------------- */

static void
find_open_ports (const HlModel *model, HlFindings *findings)
{
  for (guint k = 0; k < model->open_ports->len; k++)
    {
      HlAddress at = g_array_index (model->open_ports, HlAddress, k);
      const HlComponent *component = hl_plant_find_component (model->plant, at.id);
      guint n;
      if (component == NULL || !hl_component_find_port (component, at.key, &n))
        continue;
      g_autofree char *port = hl_component_port_name (component, n);
      HlFinding *finding = hl_findings_add (findings, HL_GRADE_ERROR, "open-port", at,
        g_strdup_printf (_("%s is not connected at its %s. Draw a line to it."), at.id, port));
      hl_finding_mend (finding, HL_MEND_CONNECT, at, NAN, g_strdup_printf (_("Show %s of %s"), port, at.id));
    }
  for (guint c = 0; c < hl_plant_n_components (model->plant); c++)
    {
      const HlComponent *component = hl_plant_component (model->plant, c);
      if (hl_component_model (component->kind) == NULL)
        hl_findings_add (findings, HL_GRADE_ERROR, "unknown-kind", hl_address_component (component->id, g_intern_static_string ("")),
          g_strdup_printf (_("%s is a %s, which this version cannot calculate. Remove it or put another kind in its place."), component->id, _(component->kind->name)));
    }
}

/* --- too many values ------------------------------------------------------------------- */

GArray *
hl_diagnose_surplus (const HlModel *model, const int *equations, int n)
{
  HlSystem *system = model->system;
  GArray *list = g_array_new (FALSE, FALSE, sizeof (int));
  g_autofree gboolean *touched = g_new0 (gboolean, system->vars->len + 1);
  g_autofree gboolean *in_part = g_new0 (gboolean, system->equations->len + 1);
  for (int k = 0; k < n; k++)
    {
      const HlEquation *e = hl_system_equation (system, equations[k]);
      const int *vars = hl_equation_vars (system, e);
      in_part[equations[k]] = TRUE;
      for (int i = 0; i < e->n; i++)
        touched[vars[i]] = TRUE;
    }
  for (guint k = 0; k < system->specs->len; k++)
    {
      const HlSpec *spec = hl_system_spec (system, k);
      int root = system->root[spec->var];
      gboolean fixes = system->fixed_by[root] == (int) k && touched[root];
      if ((fixes || (spec->equation >= 0 && in_part[spec->equation])) && spec->address.key[0] != '\0')
        {
          int index = (int) k;
          g_array_append_val (list, index);
        }
    }
  return list;
}

/* What goes first: assumed values; then of the typed ones what is a result by nature, flows and powers before states; last what
 * the kind usually has given, efficiencies and losses above all. */
static int
surplus_order (const HlModel *model, int index)
{
  const HlSpec *spec = hl_system_spec (model->system, index);
  const HlQuantityKind *kind = hl_plant_quantity_kind (model->plant, &spec->address);
  int order = spec->origin == HL_ORIGIN_ASSUMED ? 0 : 1000;
  if (kind == NULL)
    return order;
  if (spec->origin == HL_ORIGIN_ASSUMED)
    return order + kind->yield_rank;
  if (spec->address.owner == HL_OWNER_PLANT)
    return order + 90 + kind->yield_rank;
  if (kind->dimension == HL_DIMENSION_MASS_FLOW)
    order -= 30;
  return order + kind->yield_rank + (kind->flags & HL_QUANTITY_USUAL ? 100 : 0) + (kind->flags & HL_QUANTITY_ASSUMED ? 150 : 0);
}

static void
sort_surplus (const HlModel *model, GArray *specs)
{
  int *list = (int *) (void *) specs->data;
  for (guint i = 1; i < specs->len; i++)
    {
      int moving = list[i];
      guint k = i;
      for (; k > 0 && surplus_order (model, list[k - 1]) > surplus_order (model, moving); k--)
        list[k] = list[k - 1];
      list[k] = moving;
    }
}

static char *
spec_with_value (const HlModel *model, const HlSpec *spec)
{
  const HlQuantityKind *kind = hl_plant_quantity_kind (model->plant, &spec->address);
  g_autofree char *name = hl_plant_describe (model->plant, &spec->address);
  if (spec->origin == HL_ORIGIN_TIED || kind == NULL)
    return g_strdup_printf (_("%s (tied)"), name);
  g_autofree char *value = hl_quantity_format (kind, hl_var_to_si (hl_system_var (model->system, spec->var)->kind, spec->value), hl_plant_units (model->plant));
  return g_strdup_printf ("%s (%s)", name, value);
}

/* Does what flows in there fall to the pressure behind by itself?  A valve before it would change nothing. */
static gboolean
throttles_itself (const HlModel *model, const HlStream *stream)
{
  static const struct { const char *kind, *port; } inlets[] = {
    { "flash_vessel", "inlet" }, { "valve", "inlet" }, { "bypass_station", "steam" }, { "bypass_station", "spray" }, { "desuperheater", "spray" },
    { "closed_heater", "drain_inlet" }, { "condenser", "drain" }, { "air_condenser", "drain" }, { "district_heater", "drain_inlet" },
  };
  const HlComponent *to = hl_plant_find_component (model->plant, stream->to_id);
  for (guint k = 0; to != NULL && k < G_N_ELEMENTS (inlets); k++)
    if (g_str_equal (to->kind->id, inlets[k].kind) && g_str_equal (stream->to_port, inlets[k].port))
      return TRUE;
  return FALSE;
}

/* A stream on the way between the owners of two pressures, for a valve. */
static int
stream_between (const HlModel *model, const HlSpec *a, const HlSpec *b)
{
  int root = model->system->root[a->var];
  for (guint i = 0; i < hl_plant_n_streams (model->plant); i++)
    {
      const HlStream *stream = hl_plant_stream (model->plant, i);
      const HlNode *node = hl_model_node (model, (int) i);
      if (model->system->root[node->p] != root || throttles_itself (model, stream))
        continue;
      if ((stream->from_id == a->address.id && stream->to_id == b->address.id) || (stream->from_id == b->address.id && stream->to_id == a->address.id))
        return (int) i;
    }
  for (guint i = 0; i < hl_plant_n_streams (model->plant); i++)
    {
      const HlStream *stream = hl_plant_stream (model->plant, i);
      const HlNode *node = hl_model_node (model, (int) i);
      if (model->system->root[node->p] == root && !throttles_itself (model, stream)
          && (stream->from_id == a->address.id || stream->to_id == a->address.id || stream->from_id == b->address.id || stream->to_id == b->address.id))
        return (int) i;
    }
  return -1;
}

static void
offer_to_let_go (const HlModel *model, HlFinding *finding, const GArray *specs)
{
  for (guint k = 0; k < MIN (specs->len, MOST_NAMED); k++)
    {
      const HlSpec *spec = hl_system_spec (model->system, g_array_index (specs, int, k));
      g_autofree char *name = hl_plant_describe (model->plant, &spec->address);
      hl_finding_mend (finding, HL_MEND_LET_GO, spec->address, NAN, g_strdup_printf (_("Let %s be found"), name));
    }
}

/* Two typed pressures of what has only one. */
static gboolean
find_meeting_pressures (const HlModel *model, const GArray *specs, HlFindings *findings)
{
  HlSystem *system = model->system;
  for (guint i = 0; i < specs->len; i++)
    for (guint k = i + 1; k < specs->len; k++)
      {
        const HlSpec *a = hl_system_spec (system, g_array_index (specs, int, i)), *b = hl_system_spec (system, g_array_index (specs, int, k));
        if (a->origin == HL_ORIGIN_TIED || b->origin == HL_ORIGIN_TIED || system->root[a->var] != system->root[b->var]
            || hl_system_var (system, a->var)->kind != HL_VAR_PRESSURE)
          continue;
        g_autofree char *first = spec_with_value (model, a), *second = spec_with_value (model, b);
        int stream = stream_between (model, a, b);
        HlFinding *finding = hl_findings_add (findings, HL_GRADE_ERROR, "pressures-meet", a->address,
          stream >= 0
            ? g_strdup_printf (_("Two pressures meet: %s and %s are one and the same. Let one of them be found, or insert a throttle valve between them."), first, second)
            : g_strdup_printf (_("Two pressures meet: %s and %s are one and the same. Let one of them be found."), first, second));
        if (stream >= 0)
          {
            const char *id = hl_plant_stream (model->plant, (guint) stream)->id;
            hl_finding_mend (finding, HL_MEND_INSERT_VALVE, hl_address_stream (id, g_intern_static_string ("")), NAN,
                             g_strdup_printf (_("Insert a throttle valve in stream %s"), id));
          }
        offer_to_let_go (model, finding, specs);
        return TRUE;
      }
  return FALSE;
}

/* Splits equations into groups that share free variables; group[k] is the first member of k's group. */
static int *
group_equations (const HlModel *model, const int *equations, int n)
{
  HlSystem *system = model->system;
  int *group = g_new (int, n + 1);
  g_autofree int *first_use = g_new (int, system->vars->len + 1);
  for (guint v = 0; v <= system->vars->len; v++)
    first_use[v] = -1;
  for (int k = 0; k < n; k++)
    group[k] = k;
  for (int k = 0; k < n; k++)
    {
      const HlEquation *e = hl_system_equation (system, equations[k]);
      const int *vars = hl_equation_vars (system, e);
      for (int i = 0; i < e->n; i++)
        {
          if (system->fixed_by[vars[i]] >= 0)
            continue;
          if (first_use[vars[i]] < 0)
            first_use[vars[i]] = k;
          int a = first_use[vars[i]], b = k;
          while (group[a] != a)
            a = group[a];
          while (group[b] != b)
            b = group[b];
          group[MAX (a, b)] = MIN (a, b);
        }
    }
  for (int k = 0; k < n; k++)
    while (group[k] != group[group[k]])
      group[k] = group[group[k]];
  return group;
}

/* Equations of a group less the unknowns that they share. */
static int
excess (const HlModel *model, const int *equations, int n)
{
  HlSystem *system = model->system;
  g_autofree gboolean *seen = g_new0 (gboolean, system->vars->len + 1);
  int n_vars = 0;
  for (int k = 0; k < n; k++)
    {
      const HlEquation *e = hl_system_equation (system, equations[k]);
      const int *vars = hl_equation_vars (system, e);
      for (int i = 0; i < e->n; i++)
        if (system->fixed_by[vars[i]] < 0 && !seen[vars[i]])
          {
            seen[vars[i]] = TRUE;
            n_vars++;
          }
    }
  return n - n_vars;
}

static void
find_surplus_group (const HlModel *model, const int *equations, int n, HlFindings *findings)
{
  g_autoptr (GArray) specs = hl_diagnose_surplus (model, equations, n);
  sort_surplus (model, specs);
  if (specs->len == 0)
    {
      g_autofree char *where = hl_name_components (model, equations, n);
      int component = hl_system_equation (model->system, equations[0])->component;
      HlAddress at = component >= 0 ? hl_address_component (hl_plant_component (model->plant, (guint) component)->id, g_intern_static_string (""))
                                    : hl_address_plant (g_intern_static_string (""));
      hl_findings_add (findings, HL_GRADE_ERROR, "surplus-value", at,
        g_strdup_printf (_("What %s demand contradicts itself, whatever the values. Look at how they are connected."), where));
      return;
    }
  if (find_meeting_pressures (model, specs, findings))
    return;
  g_autoptr (GPtrArray) names = g_ptr_array_new_with_free_func (g_free);
  for (guint k = 0; k < MIN (specs->len, MOST_NAMED); k++)
    g_ptr_array_add (names, spec_with_value (model, hl_system_spec (model->system, g_array_index (specs, int, k))));
  g_autofree char *list = hl_name_list ((char **) names->pdata, names->len, TRUE);
  const HlSpec *first = hl_system_spec (model->system, g_array_index (specs, int, 0));
  int n_surplus = excess (model, equations, n);
  HlFinding *finding = hl_findings_add (findings, HL_GRADE_ERROR, "surplus-value", first->address,
    n_surplus > 1 ? g_strdup_printf (_("%d values too many: let some be found, for instance %s."), n_surplus, list)
                  : g_strdup_printf (_("One value too many: let one of these be found: %s."), list));
  offer_to_let_go (model, finding, specs);
}

static void
find_surplus (const HlModel *model, const HlStructure *structure, HlFindings *findings)
{
  g_autofree int *group = group_equations (model, structure->over, structure->n_over);
  g_autofree int *members = g_new (int, structure->n_over + 1);
  for (int g = 0; g < structure->n_over; g++)
    {
      int n = 0;
      if (group[g] != g)
        continue;
      for (int k = g; k < structure->n_over; k++)
        if (group[k] == g)
          members[n++] = structure->over[k];
      find_surplus_group (model, members, n, findings);
    }
}

/* --- missing values ------------------------------------------------------------------------ */

typedef struct {
  HlAddress address;
  int       root;
  int       group;
  double    score, value;
} Candidate;

typedef struct {
  const HlModel     *model;
  const HlStructure *structure;
  int               *group_of;       /* [n vars] of roots; -1 */
  GArray            *candidates;
} Missing;

static int
open_root (const Missing *missing, int var)
{
  if (var < 0)
    return -1;
  int root = missing->model->system->root[var];
  return missing->structure->is_open[root] ? root : -1;
}

/* The open variable that a value at this address would settle; -1. */
static int
would_settle (const Missing *missing, const HlAddress *address)
{
  const HlModel *model = missing->model;
  int node, root;
  char letter;
  if (!hl_model_find_state (model, address, &node, &letter))
    return open_root (missing, hl_model_find_var (model, address));
  const HlNode *n = hl_model_node (model, node);
  switch (letter)
    {
    case 'm': return open_root (missing, n->m);
    case 'p': return open_root (missing, n->p);
    default:
      root = open_root (missing, n->h);
      return root >= 0 ? root : -1;
    }
}

static void
consider (Missing *missing, HlAddress address, const HlQuantityKind *kind, int number, double bonus)
{
  if (hl_plant_value (missing->model->plant, &address) != NULL)
    return;
  int root = would_settle (missing, &address);
  if (root < 0)
    return;
  const HlComponent *owner = address.owner == HL_OWNER_COMPONENT ? hl_plant_find_component (missing->model->plant, address.id) : NULL;
  Candidate c = { address, root, missing->group_of[root], bonus, hl_component_default (owner, kind, number) };
  if (kind->flags & HL_QUANTITY_USUAL)
    c.score += 100.0;
  if (kind->flags & HL_QUANTITY_ASSUMED)
    c.score += 50.0;
  if (isfinite (c.value))
    c.score += 5.0;
  for (guint k = 0; k < missing->candidates->len; k++)
    {
      Candidate *other = &g_array_index (missing->candidates, Candidate, k);
      if (other->root != root)
        continue;
      if (c.score > other->score)
        *other = c;
      return;
    }
  g_array_append_val (missing->candidates, c);
}

static void
consider_all (Missing *missing)
{
  HlPlant *plant = missing->model->plant;
  guint n;
  for (guint c = 0; c < hl_plant_n_components (plant); c++)
    {
      const HlComponent *component = hl_plant_component (plant, c);
      for (guint k = 0; k < hl_component_n_quantities (component); k++)
        {
          HlQuantity quantity = hl_component_quantity (component, k);
          consider (missing, hl_address_component (component->id, quantity.key), quantity.kind, quantity.number,
                    component->kind->letter[0] == 'Y' ? -60.0 : 1.0);
        }
    }
  const HlQuantityKind *kinds = hl_plant_quantities (&n);
  for (guint k = 0; k < n; k++)
    consider (missing, hl_address_plant (g_intern_static_string (kinds[k].key)), &kinds[k], 0, -52.0);
  kinds = hl_stream_quantities (&n);
  for (guint i = 0; i < hl_plant_n_streams (plant); i++)
    for (guint k = 0; k < n; k++)
      consider (missing, hl_address_stream (hl_plant_stream (plant, i)->id, g_intern_static_string (kinds[k].key)), &kinds[k], 0, -120.0 - k);
}

static int
compare_candidates (gconstpointer a, gconstpointer b)
{
  const Candidate *first = a, *second = b;
  return first->score < second->score ? 1 : first->score > second->score ? -1 : 0;
}

/* Other values of the component that lacks one say more than those far away. */
static void
prefer_neighbours (GArray *candidates, int group)
{
  const Candidate *best = NULL;
  for (guint k = 0; k < candidates->len && best == NULL; k++)
    if (g_array_index (candidates, Candidate, k).group == group)
      best = &g_array_index (candidates, Candidate, k);
  if (best == NULL)
    return;
  HlAddress address = best->address;
  for (guint k = 0; k < candidates->len; k++)
    {
      Candidate *c = &g_array_index (candidates, Candidate, k);
      if (c->group == group && address.owner == HL_OWNER_COMPONENT && c->address.owner == address.owner && c->address.id == address.id)
        c->score += 40.0;
    }
  g_array_sort (candidates, compare_candidates);
}

static void
offer_value (const HlModel *model, HlFinding *finding, const Candidate *c)
{
  const HlQuantityKind *kind = hl_plant_quantity_kind (model->plant, &c->address);
  g_autofree char *name = hl_plant_describe (model->plant, &c->address);
  double value = c->value;
  if (!isfinite (value) && g_str_has_suffix (c->address.key, "exhaust.p"))
    value = 7000.0;
  if (!isfinite (value) || kind == NULL)
    {
      hl_finding_mend (finding, HL_MEND_EDIT, c->address, NAN, g_strdup_printf (_("Enter %s"), name));
      return;
    }
  g_autofree char *text = hl_quantity_format (kind, value, hl_plant_units (model->plant));
  hl_finding_mend (finding, HL_MEND_GIVE, c->address, value, g_strdup_printf (_("Give %s: %s"), name, text));
}

static void
report_missing (const Missing *missing, int group, int n_missing, HlFindings *findings)
{
  const HlModel *model = missing->model;
  g_autoptr (GPtrArray) names = g_ptr_array_new_with_free_func (g_free);
  g_autoptr (GArray) chosen = g_array_new (FALSE, FALSE, sizeof (Candidate));
  for (guint k = 0; k < missing->candidates->len && names->len < MOST_NAMED; k++)
    {
      const Candidate *c = &g_array_index (missing->candidates, Candidate, k);
      if (c->group != group)
        continue;
      g_ptr_array_add (names, hl_plant_describe (model->plant, &c->address));
      g_array_append_vals (chosen, c, 1);
    }
  g_autofree char *list = hl_name_list ((char **) names->pdata, names->len, TRUE);
  HlAddress at = chosen->len > 0 ? g_array_index (chosen, Candidate, 0).address : hl_address_plant (g_intern_static_string (""));
  char *text = n_missing == 1 ? g_strdup_printf (_("One value is missing: %s."), list)
                              : g_strdup_printf (_("%d values are missing, for instance %s."), n_missing, list);
  HlFinding *finding = hl_findings_add (findings, HL_GRADE_ERROR, "missing-value", at, text);
  for (guint k = 0; k < chosen->len; k++)
    offer_value (model, finding, &g_array_index (chosen, Candidate, k));
}

/* Groups of open variables that hang together: a number each, by the smallest variable. */
static void
group_open (Missing *missing)
{
  const HlModel *model = missing->model;
  const HlStructure *s = missing->structure;
  HlSystem *system = model->system;
  int *group = missing->group_of;
  for (guint v = 0; v <= system->vars->len; v++)
    group[v] = -1;
  for (int k = 0; k < s->n_open; k++)
    group[s->open[k]] = s->open[k];
  for (int k = 0; k < s->n_open_equations; k++)
    {
      const HlEquation *e = hl_system_equation (system, s->open_equations[k]);
      const int *vars = hl_equation_vars (system, e);
      int first = -1;
      for (int i = 0; i < e->n; i++)
        {
          int root = vars[i];
          if (group[root] < 0)
            continue;
          while (group[root] != root)
            root = group[root];
          if (first < 0)
            first = root;
          else
            {
              int keep = MIN (first, root);
              group[MAX (first, root)] = keep;
              first = keep;
            }
        }
    }
  for (int k = 0; k < s->n_open; k++)
    {
      int root = s->open[k];
      while (group[root] != root)
        root = group[root];
      group[s->open[k]] = root;
    }
  for (int k = 0; k < s->n_last; k++)
    {
      const HlEquation *e = hl_system_equation (system, s->last[k]);
      const int *vars = hl_equation_vars (system, e);
      int output = vars[e->output];
      for (int i = 0; i < e->n && group[output] < 0; i++)
        if (vars[i] != output)
          group[output] = group[vars[i]];
    }
}

static void
find_missing (const HlModel *model, const HlStructure *s, HlFindings *findings)
{
  HlSystem *system = model->system;
  Missing missing = { model, s, g_new (int, system->vars->len + 1), g_array_new (FALSE, FALSE, sizeof (Candidate)) };
  g_autofree int *balance = g_new0 (int, system->vars->len + 1);
  group_open (&missing);
  consider_all (&missing);
  g_array_sort (missing.candidates, compare_candidates);
  for (int k = 0; k < s->n_open; k++)
    balance[missing.group_of[s->open[k]]]++;
  for (int k = 0; k < s->n_open_equations; k++)
    {
      const HlEquation *e = hl_system_equation (system, s->open_equations[k]);
      const int *vars = hl_equation_vars (system, e);
      for (int i = 0; i < e->n; i++)
        if (missing.group_of[vars[i]] >= 0)
          {
            balance[missing.group_of[vars[i]]]--;
            break;
          }
    }
  for (guint v = 0; v < system->vars->len; v++)
    if (balance[v] > 0)
      {
        prefer_neighbours (missing.candidates, (int) v);
        report_missing (&missing, (int) v, balance[v], findings);
      }
  g_array_unref (missing.candidates);
  g_free (missing.group_of);
}

gboolean
hl_diagnose_structure (const HlModel *model, const HlStructure *structure, HlFindings *findings)
{
  find_open_ports (model, findings);
  if (hl_diagnose_media (model, findings))
    return FALSE;
  if (!hl_diagnose_ties (model, findings) || hl_diagnose_leaks (model, findings))
    return FALSE;
  if (structure->n_over > 0)
    find_surplus (model, structure, findings);
  if (structure->n_missing > 0 && model->open_ports->len == 0)
    find_missing (model, structure, findings);
  return structure->n_over == 0;
}
