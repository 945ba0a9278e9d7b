/* Second law of the whole plant: what comes in, what is made, lost and destroyed, and where.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "engine/exergy.h"
#include "engine/solution-private.h"
#include "fluid/gas.h"
#include <math.h>
#include <string.h>

static void
add_flow (HlSolution *solution, HlExergyFlowKind kind, int component, double power)
{
  HlExergyFlow flow = { kind, component, power };
  if (fabs (power) > 0.0 && isfinite (power))
    g_array_append_val (solution->exergy->flows, flow);
}

/* Circuits of which only the difference between what comes in and goes out says something: of cooling water, a loss; of
 * district water, what is delivered. */
typedef enum { CIRCUIT_WORK, CIRCUIT_COOLING, CIRCUIT_DISTRICT } CircuitUse;

static CircuitUse
use_of (const HlSolution *solution, int node)
{
  const HlModel *model = solution->model;
  /* Hot gas is what such a plant lives on, and what its stack lets go is a loss. */
  if (!solution->states[node].is_service || hl_fluid_is_gas (hl_model_node (model, node)->fluid))
    return CIRCUIT_WORK;
  for (guint c = 0; c < hl_plant_n_components (solution->plant); c++)
    {
      int water = g_str_equal (hl_plant_component (solution->plant, c)->kind->id, "district_heater")
                  ? hl_model_port_node (model, (int) c, "water_outlet") : -1;
      if (water >= 0 && solution->circuits[water] == solution->circuits[node])
        return CIRCUIT_DISTRICT;
    }
  return CIRCUIT_COOLING;
}

/* A stream at a boundary, counted in, stands for its whole circuit where only the difference counts. */
typedef struct { int circuit, component; CircuitUse use; double power; } Net;

static void
add_stream (HlSolution *solution, GArray *nets, guint component, int node, double power)
{
  CircuitUse use = use_of (solution, node);
  if (use == CIRCUIT_WORK)
    {
      add_flow (solution, power > 0.0 ? HL_EXERGY_STREAM_IN : HL_EXERGY_STREAM_OUT, (int) component, fabs (power));
      return;
    }
  for (guint k = 0; k < nets->len; k++)
    {
      Net *net = &g_array_index (nets, Net, k);
      if (net->circuit != solution->circuits[node])
        continue;
      /* Named after where it leaves. */
      if (power < 0.0)
        net->component = (int) component;
      net->power += power;
      return;
    }
  Net net = { solution->circuits[node], (int) component, use, power };
  g_array_append_val (nets, net);
}

static void
add_doors (HlSolution *solution, GArray *nets, guint c)
{
  const HlExergy *exergy = solution->exergy;
  double sums[HL_DOOR_LOSS + 1] = { 0.0 };
  for (guint k = exergy->first[c]; k < exergy->first[c + 1]; k++)
    {
      const HlExergyTerm *term = &g_array_index (exergy->terms, HlExergyTerm, k);
      double x, s;
      if (term->door == HL_DOOR_NONE || !hl_exergy_evaluate (solution, term, &x, &s, NULL, NULL))
        continue;
      if (term->door == HL_DOOR_STREAM)
        add_stream (solution, nets, c, term->node, x);
      else
        sums[term->door] += x;
    }
  add_flow (solution, HL_EXERGY_FUEL, (int) c, sums[HL_DOOR_FUEL]);
  add_flow (solution, HL_EXERGY_HEAT, (int) c, sums[HL_DOOR_HEAT]);
  add_flow (solution, HL_EXERGY_DELIVERED, (int) c, -sums[HL_DOOR_DELIVERED]);
  add_flow (solution, sums[HL_DOOR_LOSS] > 0.0 ? HL_EXERGY_COLD : HL_EXERGY_LOSS, (int) c, fabs (sums[HL_DOOR_LOSS]));
}

static double
sum_of (const HlSolution *solution, HlSum which)
{
  const GArray *parts = solution->model->sums[which];
  double sum = 0.0;
  for (guint k = 0; k < parts->len; k++)
    sum += hl_system_value (solution->model->system, g_array_index (parts, int, k));
  return sum;
}

static double
other_consumption (const HlSolution *solution)
{
  int var = hl_model_own_var (solution->model, -1, "other_consumption");
  return var >= 0 ? hl_system_value (solution->model->system, var) : 0.0;
}

/* Everything, once all is known; by kind, within a kind in the order of the plant. */
static int
compare_flows (gconstpointer a, gconstpointer b)
{
  const HlExergyFlow *x = a, *y = b;
  return x->kind != y->kind ? (int) x->kind - (int) y->kind : x->component - y->component;
}

void
hl_exergy_collect (HlSolution *solution)
{
  const HlExergy *exergy = solution->exergy;
  guint n = hl_plant_n_components (solution->plant);
  if (!solution->is_complete)
    return;
  for (guint c = 0; c < n; c++)
    if (!exergy->results[c].is_known && exergy->first[c + 1] > exergy->first[c])
      return;
  g_autoptr (GArray) nets = g_array_new (FALSE, FALSE, sizeof (Net));
  for (guint c = 0; c < n; c++)
    {
      add_doors (solution, nets, c);
      if (exergy->results[c].words != NULL)
        add_flow (solution, HL_EXERGY_DESTRUCTION, (int) c, exergy->results[c].destruction);
    }
  for (guint k = 0; k < nets->len; k++)
    {
      const Net *net = &g_array_index (nets, Net, k);
      if (net->use == CIRCUIT_DISTRICT)
        add_flow (solution, HL_EXERGY_DELIVERED, net->component, -net->power);
      else
        add_flow (solution, net->power > 0.0 ? HL_EXERGY_COLD : HL_EXERGY_LOSS, net->component, fabs (net->power));
    }
  double other = other_consumption (solution), electricity = sum_of (solution, HL_SUM_GROSS) - sum_of (solution, HL_SUM_MOTOR_POWER) - other;
  add_flow (solution, HL_EXERGY_OTHER, -1, other);
  add_flow (solution, electricity > 0.0 ? HL_EXERGY_NET : HL_EXERGY_ELECTRICITY, -1, fabs (electricity));
  g_array_sort (exergy->flows, compare_flows);
}

static guint
owner_of (const HlExergy *exergy, guint term)
{
  guint c = 0;
  while (exergy->first[c + 1] <= term)
    c++;
  return c;
}

static gboolean
is_end_of_streams (const char *kind)
{
  return g_str_equal (kind, "boundary") || g_str_equal (kind, "gas_source") || g_str_equal (kind, "stack");
}

gboolean
hl_exergy_is_part (const HlSolution *solution, guint n, const HlExergyFlow *flow)
{
  const HlExergyTerm *term = &g_array_index (solution->exergy->terms, HlExergyTerm, n);
  guint owner = owner_of (solution->exergy, n);
  double x, s;
  if (term->door == HL_DOOR_NONE)
    return FALSE;
  if (term->door != HL_DOOR_STREAM)
    return (int) owner == flow->component && (term->door == HL_DOOR_LOSS ? flow->kind == HL_EXERGY_LOSS || flow->kind == HL_EXERGY_COLD
                                              : term->door == HL_DOOR_DELIVERED ? flow->kind == HL_EXERGY_DELIVERED
                                              : term->door == HL_DOOR_FUEL ? flow->kind == HL_EXERGY_FUEL : flow->kind == HL_EXERGY_HEAT);
  if (!hl_exergy_evaluate (solution, term, &x, &s, NULL, NULL))
    return FALSE;
  if (use_of (solution, term->node) == CIRCUIT_WORK)
    return (int) owner == flow->component && flow->kind == (x > 0.0 ? HL_EXERGY_STREAM_IN : HL_EXERGY_STREAM_OUT);
  /* One boundary of the circuit stands for all of it. */
  if (flow->component < 0 || flow->kind == HL_EXERGY_STREAM_IN || flow->kind == HL_EXERGY_STREAM_OUT)
    return FALSE;
  const HlModel *model = solution->model;
  for (int k = model->first_port[flow->component]; k < model->first_port[flow->component + 1]; k++)
    if (is_end_of_streams (hl_plant_component (solution->plant, (guint) flow->component)->kind->id)
        && solution->circuits[g_array_index (model->ports, HlPortNode, k).node] == solution->circuits[term->node])
      return TRUE;
  return FALSE;
}

/* --- results of the plant --------------------------------------------------------- */

typedef enum { SHARE_INPUT, SHARE_PRODUCT, SHARE_LOSS, SHARE_DESTRUCTION, N_SHARES } Share;

static Share
share_of (HlExergyFlowKind kind)
{
  switch (kind)
    {
    case HL_EXERGY_FUEL: case HL_EXERGY_HEAT: case HL_EXERGY_STREAM_IN: case HL_EXERGY_COLD: case HL_EXERGY_ELECTRICITY:
      return SHARE_INPUT;
    case HL_EXERGY_NET: case HL_EXERGY_DELIVERED:
      return SHARE_PRODUCT;
    case HL_EXERGY_LOSS: case HL_EXERGY_STREAM_OUT: case HL_EXERGY_OTHER:
      return SHARE_LOSS;
    case HL_EXERGY_DESTRUCTION: default:
      return SHARE_DESTRUCTION;
    }
}

static void
share (const HlSolution *solution, double sums[N_SHARES])
{
  memset (sums, 0, sizeof (double) * N_SHARES);
  for (guint k = 0; k < solution->exergy->flows->len; k++)
    {
      const HlExergyFlow *flow = &g_array_index (solution->exergy->flows, HlExergyFlow, k);
      sums[share_of (flow->kind)] += flow->power;
    }
}

/* Which shares a key sums up; FALSE for a key of something else. */
static gboolean
shares_of_key (const char *key, Share *which, gboolean *is_ratio)
{
  static const struct { const char *key; Share share; } keys[] = {
    { "exergy_input", SHARE_INPUT }, { "exergy_product", SHARE_PRODUCT }, { "exergy_loss", SHARE_LOSS },
    { "exergy_destruction", SHARE_DESTRUCTION },
  };
  *is_ratio = g_str_equal (key, "exergy_efficiency");
  *which = SHARE_PRODUCT;
  for (guint k = 0; k < G_N_ELEMENTS (keys); k++)
    if (g_str_equal (key, keys[k].key))
      {
        *which = keys[k].share;
        return TRUE;
      }
  return *is_ratio;
}

gboolean
hl_exergy_flow_counts (int kind, const char *key)
{
  Share which;
  gboolean is_ratio;
  return shares_of_key (key, &which, &is_ratio) && !is_ratio && share_of ((HlExergyFlowKind) kind) == which;
}

gboolean
hl_exergy_plant_value (const HlSolution *solution, const char *key, double *value)
{
  double sums[N_SHARES];
  Share which;
  gboolean is_ratio;
  if (!shares_of_key (key, &which, &is_ratio) || solution->exergy->flows->len == 0)
    return FALSE;
  share (solution, sums);
  if (!(sums[SHARE_INPUT] > 0.0))
    return FALSE;
  *value = is_ratio ? sums[SHARE_PRODUCT] / sums[SHARE_INPUT] : sums[which];
  return TRUE;
}

/* --- their slopes ------------------------------------------------------------------- */

typedef struct {
  const HlSolution *solution;
  double            weights[N_SHARES];
  HlExergyAdd       add;
  gpointer          data;
  gboolean          is_good;
} Sloping;

static void
slope_term (Sloping *s, const HlExergyTerm *term, double weight)
{
  HlExergySlope slopes[HL_EXERGY_SLOPES];
  double x, entropy;
  int n;
  s->is_good = s->is_good && hl_exergy_evaluate (s->solution, term, &x, &entropy, slopes, &n);
  for (int k = 0; s->is_good && k < n; k++)
    s->add (s->data, slopes[k].var, weight * slopes[k].exergy);
}

/* Weight with which a door's term, counted in, has its share. */
static double
weight_of_door (const Sloping *s, HlExergyDoor door, double power)
{
  switch (door)
    {
    case HL_DOOR_FUEL: case HL_DOOR_HEAT:
      return s->weights[SHARE_INPUT];
    case HL_DOOR_DELIVERED:
      return -s->weights[SHARE_PRODUCT];
    case HL_DOOR_LOSS: case HL_DOOR_STREAM: case HL_DOOR_NONE: default:
      return power > 0.0 ? s->weights[SHARE_INPUT] : -s->weights[SHARE_LOSS];
    }
}

/* Of a boundary's stream, which may stand for its circuit. */
static double
weight_of_stream (const Sloping *s, const HlExergyTerm *term, double power)
{
  const HlSolution *solution = s->solution;
  CircuitUse use = use_of (solution, term->node);
  if (use == CIRCUIT_DISTRICT)
    return -s->weights[SHARE_PRODUCT];
  if (use == CIRCUIT_WORK)
    return weight_of_door (s, HL_DOOR_STREAM, power);
  double net = 0.0, x, entropy;
  for (guint k = 0; k < solution->exergy->terms->len; k++)
    {
      const HlExergyTerm *other = &g_array_index (solution->exergy->terms, HlExergyTerm, k);
      if (other->door == HL_DOOR_STREAM && solution->circuits[other->node] == solution->circuits[term->node]
          && hl_exergy_evaluate (solution, other, &x, &entropy, NULL, NULL))
        net += x;
    }
  return weight_of_door (s, HL_DOOR_LOSS, net);
}

static void
slope_component (Sloping *s, guint c)
{
  const HlExergy *exergy = s->solution->exergy;
  double losses = 0.0, x, entropy;
  for (guint k = exergy->first[c]; k < exergy->first[c + 1]; k++)
    {
      const HlExergyTerm *term = &g_array_index (exergy->terms, HlExergyTerm, k);
      if (term->door == HL_DOOR_LOSS && hl_exergy_evaluate (s->solution, term, &x, &entropy, NULL, NULL))
        losses += x;
    }
  for (guint k = exergy->first[c]; k < exergy->first[c + 1]; k++)
    {
      const HlExergyTerm *term = &g_array_index (exergy->terms, HlExergyTerm, k);
      if (term->door == HL_DOOR_NONE || !hl_exergy_evaluate (s->solution, term, &x, &entropy, NULL, NULL))
        continue;
      slope_term (s, term, term->door == HL_DOOR_STREAM ? weight_of_stream (s, term, x) : weight_of_door (s, term->door, losses));
    }
  if (fabs (s->weights[SHARE_DESTRUCTION]) > 0.0)
    s->is_good = s->is_good && (exergy->results[c].words == NULL || !exergy->results[c].is_known
                                 || hl_exergy_slopes (s->solution, (int) c, "exergy_destruction", s->add, s->data));
}

static void
slope_sum (Sloping *s, HlSum which, double weight)
{
  const GArray *parts = s->solution->model->sums[which];
  for (guint k = 0; k < parts->len; k++)
    s->add (s->data, g_array_index (parts, int, k), weight);
}

gboolean
hl_exergy_plant_slopes (const HlSolution *solution, const char *key, HlExergyAdd add, gpointer data)
{
  Sloping s = { .solution = solution, .add = add, .data = data, .is_good = TRUE };
  double value, sums[N_SHARES];
  Share which;
  gboolean is_ratio;
  if (!shares_of_key (key, &which, &is_ratio) || !hl_exergy_plant_value (solution, key, &value))
    return FALSE;
  share (solution, sums);
  s.weights[which] = is_ratio ? 1.0 / sums[SHARE_INPUT] : 1.0;
  if (is_ratio)
    s.weights[SHARE_INPUT] = -value / sums[SHARE_INPUT];
  for (guint c = 0; c < hl_plant_n_components (solution->plant); c++)
    slope_component (&s, c);
  int other = hl_model_own_var (solution->model, -1, "other_consumption");
  double consumed = other_consumption (solution);
  gboolean is_net = sum_of (solution, HL_SUM_GROSS) - sum_of (solution, HL_SUM_MOTOR_POWER) - consumed > 0.0;
  double to_electricity = is_net ? s.weights[SHARE_PRODUCT] : -s.weights[SHARE_INPUT];
  slope_sum (&s, HL_SUM_GROSS, to_electricity);
  slope_sum (&s, HL_SUM_MOTOR_POWER, -to_electricity);
  if (other >= 0)
    add (data, other, s.weights[SHARE_LOSS] - to_electricity);
  return s.is_good;
}
