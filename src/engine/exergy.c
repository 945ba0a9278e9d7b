/* Second law: terms of every component, their values and their slopes, and what a component does with them.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "engine/exergy.h"
#include "engine/solution-private.h"
#include "engine/components/components.h"
#include "plant/circuit.h"
#include "plant/i18n.h"
#include <math.h>
#include <string.h>

#define MOST_SIDES 32

/* --- booking ------------------------------------------------------------------- */

int
hl_exergy_own (const HlExergySink *sink, const char *key)
{
  return hl_model_own_var (sink->model, sink->index, key);
}

int
hl_exergy_node (const HlExergySink *sink, const char *port)
{
  return hl_model_port_node (sink->model, sink->index, port);
}

static HlExergyTerm *
book (HlExergySink *sink, HlTermForm form, HlExergyRole role, double sign)
{
  HlExergyTerm term = { .form = form, .role = role, .sign = sign, .power = -1, .node = -1, .p = -1, .h = -1, .ratio = -1,
                        .a = { -1, -1, -1, NAN }, .b = { -1, -1, -1, NAN } };
  g_array_append_val (sink->terms, term);
  return &g_array_index (sink->terms, HlExergyTerm, sink->terms->len - 1);
}

HlExergyTerm *
hl_exergy_flow (HlExergySink *sink, HlExergyRole role, double sign, int flow, int node)
{
  HlExergyTerm *term = book (sink, HL_TERM_FLOW, role, sign);
  term->power = flow;
  term->node = node;
  return term;
}

HlExergyTerm *
hl_exergy_power (HlExergySink *sink, HlExergyRole role, double sign, const char *key)
{
  int var = hl_exergy_own (sink, key);
  if (var < 0)
    return NULL;
  HlExergyTerm *term = book (sink, HL_TERM_POWER, role, sign);
  term->power = var;
  return term;
}

HlExergyTerm *
hl_exergy_heat (HlExergySink *sink, HlExergyRole role, double sign, const char *key, HlExergyT a, HlExergyT b)
{
  HlExergyTerm *term = book (sink, HL_TERM_HEAT, role, sign);
  term->power = hl_exergy_own (sink, key);
  term->a = a;
  term->b = b;
  return term;
}

void
hl_exergy_sides (HlExergySink *sink, HlExergyRole role)
{
  const HlModel *model = sink->model;
  for (int k = model->first_port[sink->index]; k < model->first_port[sink->index + 1]; k++)
    {
      const HlPortNode *port = &g_array_index (model->ports, HlPortNode, k);
      HlExergyTerm *term = hl_exergy_flow (sink, role, port->is_out ? -1.0 : 1.0, hl_model_node (model, port->node)->m, port->node);
      term->side = MIN (hl_kind_side_of_port (sink->component->kind, port->key), MOST_SIDES - 1);
    }
}

static const char by_roles[] = N_("Fuel: what its sides give up, and the power that it takes; product: what its sides gain, and the power that it gives.");

/* Where a kind says nothing else: its sides, shaft or motor, and what friction takes of them. */
static void
book_by_roles (HlExergySink *sink)
{
  HlShaftRole role = sink->component->kind->shaft;
  hl_exergy_sides (sink, HL_ROLE_SIDE);
  if (role == HL_SHAFT_DRIVES)
    {
      hl_exergy_power (sink, HL_ROLE_PRODUCT, -1.0, "power");
      if (hl_exergy_own (sink, "internal_power") >= 0 && hl_exergy_power (sink, HL_ROLE_LEAK, -1.0, "internal_power") != NULL)
        hl_exergy_power (sink, HL_ROLE_LEAK, 1.0, "power");
    }
  else if (role == HL_SHAFT_DRIVEN && sink->model->is_on_shaft[sink->index])
    hl_exergy_power (sink, HL_ROLE_FUEL, 1.0, "power");
  else if (role == HL_SHAFT_DRIVEN && hl_exergy_power (sink, HL_ROLE_FUEL, 1.0, "motor_power") != NULL)
    {
      hl_exergy_power (sink, HL_ROLE_LEAK, -1.0, "motor_power");
      hl_exergy_power (sink, HL_ROLE_LEAK, 1.0, "power");
    }
}

/* --- one term ------------------------------------------------------------------- */

static HlDeadState *
dead_state (const HlExergy *exergy, const HlFluid *fluid)
{
  for (guint k = 0; k < exergy->dead->len; k++)
    if (g_array_index (exergy->dead, HlDeadState, k).fluid == fluid)
      return &g_array_index (exergy->dead, HlDeadState, k);
  return NULL;
}

gboolean
hl_exergy_of_state (const HlSolution *solution, const HlFluid *fluid, const HlState *state, double *e)
{
  const HlExergy *exergy = solution->exergy;
  const HlDeadState *dead = dead_state (exergy, fluid);
  if (dead == NULL || !dead->is_known)
    return FALSE;
  *e = state->h - dead->h - exergy->T0 * (state->s - dead->s);
  return TRUE;
}

typedef struct { HlExergySlope *list; int *n; } Slopes;

static void
slope (Slopes *slopes, int var, double exergy, double entropy)
{
  if (slopes->list != NULL)
    slopes->list[(*slopes->n)++] = (HlExergySlope) { var, exergy, entropy };
}

static gboolean
read_var (const HlSolution *solution, int var, double *value)
{
  const HlSystem *system = solution->model->system;
  if (var < 0 || !solution->numbers.is_known[system->root[var]])
    return FALSE;
  *value = hl_system_value (system, var);
  return TRUE;
}

static gboolean
evaluate_flow (const HlSolution *solution, const HlExergyTerm *term, double *exergy, double *entropy, Slopes *slopes)
{
  const HlNode *node = hl_model_node (solution->model, term->node);
  const HlNodeResult *at = &solution->states[term->node];
  HlState st = at->st;
  double m, e;
  if (!at->has_state || !read_var (solution, term->power, &m) || !hl_exergy_of_state (solution, node->fluid, &st, &e))
    return FALSE;
  *exergy = term->sign * m * e;
  *entropy = term->sign * m * st.s;
  if (slopes->list == NULL)
    return TRUE;
  if (hl_fluid_state_ph (node->fluid, at->p, hl_system_value (solution->model->system, node->h), &st) != HL_OK)
    return FALSE;
  double T0 = solution->exergy->T0, factor = term->sign * m;
  slope (slopes, term->power, term->sign * e, term->sign * st.s);
  slope (slopes, node->p, -factor * T0 * st.s_p, factor * st.s_p);
  slope (slopes, node->h, factor * (1.0 - T0 * st.s_h), factor * st.s_h);
  return TRUE;
}

static gboolean
evaluate_water (const HlSolution *solution, const HlExergyTerm *term, double *exergy, double *entropy, Slopes *slopes)
{
  double m, p, h, e, T0 = solution->exergy->T0;
  HlState st;
  if (!read_var (solution, term->power, &m) || !read_var (solution, term->p, &p) || !read_var (solution, term->h, &h)
      || hl_fluid_state_ph (term->fluid, p, h, &st) != HL_OK || !hl_exergy_of_state (solution, term->fluid, &st, &e))
    return FALSE;
  *exergy = term->sign * m * e;
  *entropy = term->sign * m * st.s;
  slope (slopes, term->power, term->sign * e, term->sign * st.s);
  slope (slopes, term->p, -term->sign * m * T0 * st.s_p, term->sign * m * st.s_p);
  slope (slopes, term->h, term->sign * m * (1.0 - T0 * st.s_h), term->sign * m * st.s_h);
  return TRUE;
}

static gboolean
read_temperature (const HlSolution *solution, const HlExergyT *t, double *T)
{
  double more = 0.0;
  if (t->node >= 0)
    {
      *T = solution->states[t->node].st.T;
      return solution->states[t->node].has_state;
    }
  if (t->var < 0)
    {
      *T = t->constant;
      return isfinite (*T);
    }
  if (!read_var (solution, t->var, T) || (t->plus >= 0 && !read_var (solution, t->plus, &more)))
    return FALSE;
  *T += more;
  return TRUE;
}

static void
slope_temperature (const HlSolution *solution, const HlExergyT *t, Slopes *slopes, double exergy, double entropy)
{
  HlState st;
  if (t->node >= 0)
    {
      const HlNode *node = hl_model_node (solution->model, t->node);
      if (hl_fluid_state_ph (node->fluid, solution->states[t->node].p, hl_system_value (solution->model->system, node->h), &st) != HL_OK)
        return;
      slope (slopes, node->p, exergy * st.T_p, entropy * st.T_p);
      slope (slopes, node->h, exergy * st.T_h, entropy * st.T_h);
    }
  else if (t->var >= 0)
    {
      slope (slopes, t->var, exergy, entropy);
      if (t->plus >= 0)
        slope (slopes, t->plus, exergy, entropy);
    }
}

static gboolean
evaluate_heat (const HlSolution *solution, const HlExergyTerm *term, double *exergy, double *entropy, Slopes *slopes)
{
  double Q, a, b, to_a, to_b, T0 = solution->exergy->T0;
  if (!read_var (solution, term->power, &Q) || !read_temperature (solution, &term->a, &a) || !read_temperature (solution, &term->b, &b)
      || !(a > 0.0 && b > 0.0))
    return FALSE;
  double T = hl_log_mean (a, b, &to_a, &to_b), Qs = term->sign * Q;
  *exergy = Qs * (1.0 - T0 / T);
  *entropy = Qs / T;
  slope (slopes, term->power, term->sign * (1.0 - T0 / T), term->sign / T);
  slope_temperature (solution, &term->a, slopes, Qs * T0 / (T * T) * to_a, -Qs / (T * T) * to_a);
  slope_temperature (solution, &term->b, slopes, Qs * T0 / (T * T) * to_b, -Qs / (T * T) * to_b);
  return TRUE;
}

/* A fuel brings its chemical exergy; its entropy is what makes it the energy less T0 times that. */
static gboolean
evaluate_fuel (const HlSolution *solution, const HlExergyTerm *term, double *exergy, double *entropy, Slopes *slopes)
{
  double Q, ratio = term->ratio_value, T0 = solution->exergy->T0;
  if (!read_var (solution, term->power, &Q) || (term->ratio >= 0 && !read_var (solution, term->ratio, &ratio)) || !isfinite (ratio))
    return FALSE;
  *exergy = term->sign * Q * ratio;
  *entropy = term->sign * Q * (1.0 - ratio) / T0;
  slope (slopes, term->power, term->sign * ratio, term->sign * (1.0 - ratio) / T0);
  if (term->ratio >= 0)
    slope (slopes, term->ratio, term->sign * Q, -term->sign * Q / T0);
  return TRUE;
}

static gboolean
evaluate_power (const HlSolution *solution, const HlExergyTerm *term, double *exergy, double *entropy, Slopes *slopes)
{
  double P, T0 = solution->exergy->T0;
  gboolean is_leak = term->role == HL_ROLE_LEAK;
  if (!read_var (solution, term->power, &P))
    return FALSE;
  *exergy = is_leak ? 0.0 : term->sign * P;
  *entropy = is_leak ? term->sign * P / T0 : 0.0;
  slope (slopes, term->power, is_leak ? 0.0 : term->sign, is_leak ? term->sign / T0 : 0.0);
  return TRUE;
}

gboolean
hl_exergy_evaluate (const HlSolution *solution, const HlExergyTerm *term, double *exergy, double *entropy, HlExergySlope *list, int *n_slopes)
{
  Slopes slopes = { list, n_slopes };
  if (list != NULL)
    *n_slopes = 0;
  switch (term->form)
    {
    case HL_TERM_FLOW: return evaluate_flow (solution, term, exergy, entropy, &slopes);
    case HL_TERM_WATER: return evaluate_water (solution, term, exergy, entropy, &slopes);
    case HL_TERM_HEAT: return evaluate_heat (solution, term, exergy, entropy, &slopes);
    case HL_TERM_FUEL: return evaluate_fuel (solution, term, exergy, entropy, &slopes);
    case HL_TERM_POWER: default: return evaluate_power (solution, term, exergy, entropy, &slopes);
    }
}

/* --- one component ---------------------------------------------------------------- */

/* Sums over the terms of a component. */
typedef struct {
  double sides[MOST_SIDES], roles[HL_ROLE_LEAK + 1], entropy, leaks;
  gboolean has_exergy, has_entropy;
} Sums;

static void
sum_up (const HlSolution *solution, guint component, Sums *sums)
{
  const HlExergy *exergy = solution->exergy;
  memset (sums, 0, sizeof *sums);
  sums->has_exergy = sums->has_entropy = exergy->first[component + 1] > exergy->first[component];
  for (guint k = exergy->first[component]; k < exergy->first[component + 1]; k++)
    {
      const HlExergyTerm *term = &g_array_index (exergy->terms, HlExergyTerm, k);
      double x, s;
      if (!hl_exergy_evaluate (solution, term, &x, &s, NULL, NULL))
        {
          sums->has_exergy = FALSE;
          /* Without a dead state the entropy of a flow is known still. */
          if (term->form != HL_TERM_FLOW || !solution->states[term->node].has_state || !read_var (solution, term->power, &s))
            {
              sums->has_entropy = FALSE;
              return;
            }
          s *= term->sign * solution->states[term->node].st.s;
          x = 0.0;
        }
      if (term->role == HL_ROLE_SIDE)
        sums->sides[term->side] += x;
      else
        sums->roles[term->role] += x;
      *(term->role == HL_ROLE_LEAK ? &sums->leaks : &sums->entropy) += s;
    }
}

static void
book_component (HlSolution *solution, guint c)
{
  HlExergy *exergy = solution->exergy;
  HlExergySink sink = { solution->model, solution->states, solution->numbers.is_known, solution->circuits,
                        hl_plant_component (solution->plant, c), (int) c, exergy->terms };
  const HlExergyKind *kind = hl_exergy_kind (sink.component->kind);
  exergy->first[c] = exergy->terms->len;
  if (kind != NULL && kind->book != NULL)
    kind->book (&sink);
  else
    book_by_roles (&sink);
  exergy->first[c + 1] = exergy->terms->len;
  exergy->results[c].words = kind != NULL ? kind->words : by_roles;
}

static void
find_result (HlSolution *solution, guint c)
{
  HlExergyResult *result = &solution->exergy->results[c];
  Sums sums;
  sum_up (solution, c, &sums);
  result->produced = sums.has_entropy ? -sums.entropy : NAN;
  result->efficiency = NAN;
  if (!sums.has_exergy)
    return;
  result->is_known = TRUE;
  result->fuel = sums.roles[HL_ROLE_FUEL];
  result->product = -sums.roles[HL_ROLE_PRODUCT];
  result->loss = MAX (-sums.roles[HL_ROLE_LOSS], 0.0);
  result->fuel += MAX (sums.roles[HL_ROLE_LOSS], 0.0);
  for (int k = 0; k < MOST_SIDES; k++)
    *(sums.sides[k] > 0.0 ? &result->fuel : &result->product) += fabs (sums.sides[k]);
  result->destruction = -solution->exergy->T0 * (sums.entropy + sums.leaks);
  if (result->words != NULL && result->product > 0.0 && result->fuel > 0.0)
    result->efficiency = result->product / result->fuel;
}

/* --- all -------------------------------------------------------------------------- */

static void
find_dead_state (HlExergy *exergy, const HlFluid *fluid)
{
  HlDeadState dead = { .fluid = fluid };
  HlState st;
  if (dead_state (exergy, fluid) != NULL)
    return;
  dead.is_known = hl_fluid_state_pT (fluid, exergy->p0, exergy->T0, &st) == HL_OK;
  dead.h = dead.is_known ? st.h : NAN;
  dead.s = dead.is_known ? st.s : NAN;
  g_array_append_val (exergy->dead, dead);
}

static void
find_dead_states (HlSolution *solution)
{
  /* District water without a line is no stream, and may be another medium than theirs. */
  find_dead_state (solution->exergy, solution->model->water);
  for (guint k = 0; k < solution->model->nodes->len; k++)
    find_dead_state (solution->exergy, hl_model_node (solution->model, (int) k)->fluid);
}

void
hl_exergy_solve (HlSolution *solution)
{
  const HlSite *site = hl_plant_site (solution->plant);
  guint n = hl_plant_n_components (solution->plant);
  HlExergy *exergy = g_new0 (HlExergy, 1);
  solution->exergy = exergy;
  exergy->T0 = site->dead_T;
  exergy->p0 = site->dead_p;
  exergy->dead = g_array_new (FALSE, FALSE, sizeof (HlDeadState));
  exergy->terms = g_array_sized_new (FALSE, FALSE, sizeof (HlExergyTerm), 8 * n + 8);
  exergy->flows = g_array_new (FALSE, FALSE, sizeof (HlExergyFlow));
  exergy->first = g_new0 (guint, n + 1);
  exergy->results = g_new0 (HlExergyResult, n + 1);
  find_dead_states (solution);
  for (guint c = 0; c < n; c++)
    {
      book_component (solution, c);
      find_result (solution, c);
    }
  hl_exergy_collect (solution);
}

void
hl_exergy_free (HlExergy *exergy)
{
  if (exergy == NULL)
    return;
  g_array_unref (exergy->dead);
  g_array_unref (exergy->terms);
  g_array_unref (exergy->flows);
  g_free (exergy->first);
  g_free (exergy->results);
  g_free (exergy);
}

/* --- slopes ------------------------------------------------------------------------ */

/* Weights of each role and side in a result, and of T0 times entropy. */
typedef struct { double sides[MOST_SIDES], roles[HL_ROLE_LEAK + 1], destruction; } Weights;

static gboolean
weigh (const HlSolution *solution, guint component, const char *key, Weights *weights)
{
  const HlExergyResult *result = &solution->exergy->results[component];
  double to_fuel = 0.0, to_product = 0.0, to_loss = 0.0;
  Sums sums;
  memset (weights, 0, sizeof *weights);
  if (g_str_equal (key, "exergy_destruction"))
    weights->destruction = 1.0;
  else if (g_str_equal (key, "exergy_fuel"))
    to_fuel = 1.0;
  else if (g_str_equal (key, "exergy_product"))
    to_product = 1.0;
  else if (g_str_equal (key, "exergy_loss"))
    to_loss = 1.0;
  else if (g_str_equal (key, "exergy_efficiency"))
    {
      to_product = 1.0 / result->fuel;
      to_fuel = -result->efficiency / result->fuel;
    }
  else
    return FALSE;
  sum_up (solution, component, &sums);
  for (int k = 0; k < MOST_SIDES; k++)
    weights->sides[k] = sums.sides[k] > 0.0 ? to_fuel : -to_product;
  weights->roles[HL_ROLE_FUEL] = to_fuel;
  weights->roles[HL_ROLE_PRODUCT] = -to_product;
  weights->roles[HL_ROLE_LOSS] = sums.roles[HL_ROLE_LOSS] > 0.0 ? to_fuel : -to_loss;
  return TRUE;
}

double
hl_exergy_weight (const HlSolution *solution, guint component, const HlExergyTerm *term, const char *key)
{
  Weights weights;
  if (!weigh (solution, component, key, &weights))
    return 0.0;
  return term->role == HL_ROLE_SIDE ? weights.sides[term->side] : weights.roles[term->role];
}

static void
add_slopes (const HlSolution *solution, guint component, const Weights *weights, HlExergyAdd add, gpointer data, gboolean *is_good)
{
  const HlExergy *exergy = solution->exergy;
  for (guint k = exergy->first[component]; k < exergy->first[component + 1]; k++)
    {
      const HlExergyTerm *term = &g_array_index (exergy->terms, HlExergyTerm, k);
      HlExergySlope slopes[HL_EXERGY_SLOPES];
      double x, s, weight = term->role == HL_ROLE_SIDE ? weights->sides[term->side] : weights->roles[term->role];
      int n;
      *is_good = *is_good && hl_exergy_evaluate (solution, term, &x, &s, slopes, &n);
      for (int i = 0; *is_good && i < n; i++)
        add (data, slopes[i].var, weight * slopes[i].exergy - weights->destruction * exergy->T0 * slopes[i].entropy);
    }
}

gboolean
hl_exergy_value (const HlSolution *solution, int component, const char *key, double *value)
{
  if (solution->exergy == NULL)
    return FALSE;
  if (component < 0)
    return hl_exergy_plant_value (solution, key, value);
  const HlExergyResult *result = &solution->exergy->results[component];
  /* What only passes exergy on has nothing to tell. */
  if (!result->is_known || result->words == NULL)
    return FALSE;
  if (g_str_equal (key, "exergy_fuel"))
    *value = result->fuel;
  else if (g_str_equal (key, "exergy_product"))
    *value = result->product;
  else if (g_str_equal (key, "exergy_loss"))
    *value = result->loss;
  else if (g_str_equal (key, "exergy_destruction"))
    *value = result->destruction;
  else if (g_str_equal (key, "exergy_efficiency"))
    *value = result->efficiency;
  else
    return FALSE;
  /* Where nothing is made, or lost, there is nothing to show. */
  return isfinite (*value) && (*value > 0.0 || (!g_str_equal (key, "exergy_product") && !g_str_equal (key, "exergy_loss")));
}

gboolean
hl_exergy_slopes (const HlSolution *solution, int component, const char *key, HlExergyAdd add, gpointer data)
{
  double value;
  Weights weights;
  gboolean is_good = TRUE;
  if (component < 0)
    return hl_exergy_plant_slopes (solution, key, add, data);
  if (!hl_exergy_value (solution, component, key, &value) || !weigh (solution, (guint) component, key, &weights))
    return FALSE;
  add_slopes (solution, (guint) component, &weights, add, data, &is_good);
  return is_good;
}
