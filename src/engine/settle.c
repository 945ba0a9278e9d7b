/* Assumed values yield to what is typed, and come back when it is let go.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "engine/engine.h"
#include "engine/circuits.h"
#include "engine/diagnose.h"
#include "engine/solution-private.h"
#include "plant/i18n.h"
#include <math.h>

#define MOST_TRIED 60

typedef struct {
  HlPlant         *plant;
  const HlAddress *edited;
  GArray          *yielded;        /* HlYield; or NULL */
  HlModel         *model;
  HlStructure     *structure;
  int             *circuits;
} Settle;

static void
analyse (Settle *settle)
{
  HlSolveEffort effort = { 0 };
  hl_solve_prepare (settle->plant, NULL, 0, &settle->model, &settle->structure, &effort);
  settle->circuits = NULL;
}

static void
forget (Settle *settle)
{
  g_clear_pointer (&settle->model, hl_model_free);
  g_clear_pointer (&settle->structure, hl_structure_free);
  g_clear_pointer (&settle->circuits, g_free);
}

static void
say (Settle *settle, const HlAddress *address, gboolean came_back)
{
  HlYield yield = { .address = *address, .came_back = came_back };
  g_autofree char *name = hl_plant_describe (settle->plant, address);
  g_autofree char *text = g_strdup_printf (came_back ? _("%s is assumed again") : _("%s is now found"), name);
  if (settle->yielded == NULL)
    return;
  g_strlcpy (yield.text, text, sizeof yield.text);
  /* A text that is cut must still be valid UTF-8. */
  const char *end;
  if (!g_utf8_validate (yield.text, -1, &end))
    yield.text[end - yield.text] = '\0';
  g_array_append_val (settle->yielded, yield);
}

/* The component whose value was edited; a stream's is the one that it comes from. */
static int
edited_component (const Settle *settle)
{
  if (settle->edited == NULL)
    return -1;
  if (settle->edited->owner == HL_OWNER_COMPONENT)
    return hl_plant_component_index (settle->plant, settle->edited->id);
  if (settle->edited->owner == HL_OWNER_STREAM)
    {
      int stream = hl_plant_stream_index (settle->plant, settle->edited->id);
      return stream >= 0 ? hl_model_node (settle->model, stream)->component : -1;
    }
  return -1;
}

static int
component_of (const Settle *settle, const HlAddress *address)
{
  if (address->owner == HL_OWNER_COMPONENT)
    return hl_plant_component_index (settle->plant, address->id);
  if (address->owner == HL_OWNER_STREAM)
    {
      int stream = hl_plant_stream_index (settle->plant, address->id);
      return stream >= 0 ? hl_model_node (settle->model, stream)->component : -1;
    }
  return -1;
}

/* How many lines apart every component is from @from. */
static int *
distances (const HlModel *model, int from)
{
  int n = (int) hl_plant_n_components (model->plant), *distance = g_new (int, n + 1), n_queue = 0;
  g_autofree int *queue = g_new (int, n + 1);
  for (int c = 0; c < n; c++)
    distance[c] = n;
  distance[from] = 0;
  queue[n_queue++] = from;
  for (int at = 0; at < n_queue; at++)
    for (int k = model->first_port[queue[at]]; k < model->first_port[queue[at] + 1]; k++)
      {
        const HlNode *node = hl_model_node (model, g_array_index (model->ports, HlPortNode, k).node);
        int other = node->component == queue[at] ? node->to_component : node->component;
        if (other < 0 || distance[other] < n)
          continue;
        distance[other] = distance[queue[at]] + 1;
        queue[n_queue++] = other;
      }
  return distance;
}

typedef struct { HlAddress address; double order, value; } Candidate;

/* A typed flow, power or heat sizes the plant: then the assumed net power is what it stands for. */
static gboolean
is_size (const Settle *settle)
{
  const HlQuantityKind *kind = hl_plant_quantity_kind (settle->plant, settle->edited);
  return kind != NULL && (kind->dimension == HL_DIMENSION_MASS_FLOW || kind->dimension == HL_DIMENSION_POWER);
}

/* Lower yields first: same component, then same circuit, then the rest; inside each by the rank of the kind's table, and among
 * equals the nearest. */
static double
order_of (Settle *settle, const HlAddress *address, int edited, const int *distance)
{
  const HlQuantityKind *kind = hl_plant_quantity_kind (settle->plant, address);
  double order = kind != NULL ? kind->yield_rank : 50.0;
  int component = component_of (settle, address);
  if (settle->edited != NULL && address->owner == HL_OWNER_PLANT && kind != NULL && kind->dimension == HL_DIMENSION_POWER && is_size (settle))
    return order - 3000.0;
  if (settle->edited != NULL && settle->edited->owner == HL_OWNER_PLANT && address->owner == HL_OWNER_PLANT)
    return order - 2000.0;
  if (edited < 0)
    return order;
  if (component >= 0)
    order += (double) distance[component] / (hl_plant_n_components (settle->plant) + 1);
  if (component == edited)
    return order - 2000.0;
  if (settle->circuits == NULL)
    settle->circuits = hl_circuits (settle->model);
  if (component >= 0 && hl_circuits_shared (settle->model, settle->circuits, component, edited))
    return order - 1000.0;
  return order;
}

static gboolean
is_edited (const Settle *settle, const HlSpec *spec)
{
  if (settle->edited == NULL)
    return FALSE;
  if (hl_address_equal (&spec->address, settle->edited))
    return TRUE;
  int var = hl_model_find_var (settle->model, settle->edited);
  return var == spec->var && spec->origin != HL_ORIGIN_ASSUMED;
}

static gboolean
replace (Settle *settle, const HlAddress *address, const HlValue *value)
{
  g_autoptr (GError) error = NULL;
  HlPlant *next = hl_plant_with_value (settle->plant, address, value, &error);
  if (next == NULL)
    return FALSE;
  hl_plant_unref (settle->plant);
  settle->plant = next;
  return TRUE;
}

static int
compare_candidates (gconstpointer a, gconstpointer b)
{
  const Candidate *first = a, *second = b;
  return first->order < second->order ? -1 : first->order > second->order ? 1 : 0;
}

/* Assumed values of the over-determined part, the first to yield first. */
static GArray *
find_candidates (Settle *settle)
{
  const HlModel *model = settle->model;
  GArray *candidates = g_array_new (FALSE, FALSE, sizeof (Candidate));
  g_autoptr (GArray) specs = hl_diagnose_surplus (model, settle->structure->over, settle->structure->n_over);
  int edited = edited_component (settle);
  g_autofree int *distance = edited >= 0 ? distances (model, edited) : NULL;
  for (guint k = 0; k < specs->len; k++)
    {
      const HlSpec *spec = hl_system_spec (model->system, g_array_index (specs, int, k));
      if (spec->origin != HL_ORIGIN_ASSUMED || is_edited (settle, spec))
        continue;
      Candidate candidate = { spec->address, order_of (settle, &spec->address, edited, distance), NAN };
      g_array_append_val (candidates, candidate);
    }
  g_array_sort (candidates, compare_candidates);
  return candidates;
}

typedef enum { CLEAN, SOLVED_WITH_ERRORS, FAILED } Outcome;

/* The structure says that a value may go; only numbers say whether what is left still settles everything, and sensibly: where
 * all flows hang on one value, one far away may look as good as one near by.  Nothing to say while more is to be settled. */
static Outcome
outcome_with (HlPlant *plant, const HlAddress *address, const HlValue *value)
{
  g_autoptr (HlPlant) changed = hl_plant_with_value (plant, address, value, NULL);
  if (changed == NULL)
    return FAILED;
  g_autoptr (HlSolution) solution = hl_solve_once (changed, NULL, HL_PATIENCE_NONE);
  if (hl_solution_is_solved (solution) || solution->structure->n_surplus > 0 || solution->structure->n_missing > 0)
    return CLEAN;
  return solution->is_complete ? SOLVED_WITH_ERRORS : FAILED;
}

/* The first candidate that leaves a sound plant, else one that leaves a solvable one, else the first. */
static guint
choose (Settle *settle, const GArray *candidates)
{
  guint best = 0;
  Outcome best_outcome = FAILED;
  for (guint k = 0; k < MIN (candidates->len, MOST_TRIED) && best_outcome != CLEAN; k++)
    {
      const Candidate *candidate = &g_array_index (candidates, Candidate, k);
      HlValue value = { .origin = HL_ORIGIN_ASSUMED, .value = candidate->value };
      Outcome outcome = outcome_with (settle->plant, &candidate->address, isnan (candidate->value) ? NULL : &value);
      if (outcome >= best_outcome)
        continue;
      best = k;
      best_outcome = outcome;
    }
  return best;
}

/* Lets one assumed value of the over-determined part go.  FALSE when none can. */
static gboolean
yield_one (Settle *settle)
{
  g_autoptr (GArray) candidates = find_candidates (settle);
  if (candidates->len == 0)
    return FALSE;
  HlAddress address = g_array_index (candidates, Candidate, choose (settle, candidates)).address;
  say (settle, &address, FALSE);
  return replace (settle, &address, NULL);
}

/* Would a value at this address settle something open? */
static gboolean
is_open (const Settle *settle, const HlAddress *address)
{
  const HlModel *model = settle->model;
  int node, var;
  char letter;
  if (hl_model_find_state (model, address, &node, &letter))
    {
      const HlNode *n = hl_model_node (model, node);
      var = letter == 'm' ? n->m : letter == 'p' ? n->p : n->h;
    }
  else
    var = hl_model_find_var (model, address);
  return var >= 0 && settle->structure->is_open[model->system->root[var]];
}

static void
consider (Settle *settle, GArray *candidates, HlAddress address, const HlQuantityKind *kind, double value, int edited, const int *distance)
{
  if (!(kind->flags & HL_QUANTITY_ASSUMED) || !isfinite (value) || hl_plant_value (settle->plant, &address) != NULL || !is_open (settle, &address))
    return;
  Candidate candidate = { address, order_of (settle, &address, edited, distance), value };
  /* What was let go comes back itself only where nothing else of its component can. */
  if (hl_address_equal (&address, settle->edited))
    candidate.order += 400.0;
  g_array_append_val (candidates, candidate);
}

/* Brings back one assumed value where the edited one left a gap: another of its component, else itself, else what had yielded
 * to it elsewhere. */
static gboolean
bring_back_one (Settle *settle)
{
  g_autoptr (GArray) candidates = g_array_new (FALSE, FALSE, sizeof (Candidate));
  int edited = edited_component (settle);
  g_autofree int *distance = edited >= 0 ? distances (settle->model, edited) : NULL;
  guint n;
  for (guint c = 0; c < hl_plant_n_components (settle->plant); c++)
    {
      const HlComponent *component = hl_plant_component (settle->plant, c);
      for (guint k = 0; k < hl_component_n_quantities (component); k++)
        {
          HlQuantity quantity = hl_component_quantity (component, k);
          consider (settle, candidates, hl_address_component (component->id, quantity.key), quantity.kind,
                    hl_component_default (component, quantity.kind, quantity.number), edited, distance);
        }
    }
  const HlQuantityKind *kinds = hl_plant_quantities (&n);
  for (guint k = 0; k < n; k++)
    consider (settle, candidates, hl_address_plant (kinds[k].key), &kinds[k], kinds[k].default_value, edited, distance);
  if (candidates->len == 0)
    return FALSE;
  g_array_sort (candidates, compare_candidates);
  const Candidate *best = &g_array_index (candidates, Candidate, choose (settle, candidates));
  HlValue back = { .origin = HL_ORIGIN_ASSUMED, .value = best->value };
  if (!replace (settle, &best->address, &back))
    return FALSE;
  say (settle, &best->address, TRUE);
  return TRUE;
}

HlPlant *
hl_settle_from (HlPlant *plant, const HlAddress *edited, const HlSolution *last, GArray **yielded)
{
  g_return_val_if_fail (plant != NULL, NULL);
  if (!hl_solve_can_reuse (last, plant))
    return hl_settle (plant, edited, yielded);
  if (yielded != NULL)
    *yielded = g_array_new (FALSE, FALSE, sizeof (HlYield));
  return hl_plant_ref (plant);
}

HlPlant *
hl_settle (HlPlant *plant, const HlAddress *edited, GArray **yielded)
{
  g_return_val_if_fail (plant != NULL, NULL);
  Settle settle = { .plant = hl_plant_ref (plant), .edited = edited };
  if (yielded != NULL)
    settle.yielded = *yielded = g_array_new (FALSE, FALSE, sizeof (HlYield));
  /* Each round takes or brings back one value; no plant needs more rounds than it has values. */
  for (int round = 0; round < 1000; round++)
    {
      analyse (&settle);
      gboolean changed = FALSE;
      if (settle.structure->n_over > 0)
        changed = yield_one (&settle);
      else if (settle.structure->n_missing > 0 && edited != NULL && settle.model->open_ports->len == 0 && settle.model->broken_ties->len == 0
               && hl_plant_value (settle.plant, edited) == NULL)
        changed = bring_back_one (&settle);
      forget (&settle);
      if (!changed)
        break;
    }
  return settle.plant;
}
