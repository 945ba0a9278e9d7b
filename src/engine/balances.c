/* Balances of the whole plant: what comes in, what goes out.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "engine/solution-private.h"
#include <math.h>
#include <string.h>

typedef struct { double sum, largest; } Balance;

static void
book (Balance *balance, double value)
{
  balance->sum += value;
  balance->largest = fmax (balance->largest, fabs (value));
}

static double
relative (const Balance *balance)
{
  return balance->largest > 0.0 ? balance->sum / balance->largest : 0.0;
}

static double
own (const HlSolution *solution, int component, const char *key)
{
  int var = hl_model_own_var (solution->model, component, key);
  return var >= 0 && solution->numbers.is_known[solution->model->system->root[var]] ? hl_system_value (solution->model->system, var) : 0.0;
}

/* Streams begin or end there. */
static gboolean
is_open_door (const char *kind)
{
  return g_str_equal (kind, "make_up") || g_str_equal (kind, "boundary") || g_str_equal (kind, "gas_source") || g_str_equal (kind, "stack");
}

/* Where a component itself is a door of the plant: flow and energy through it, in positive. */
static void
book_doors (const HlSolution *solution, int c, Balance *mass, Balance *energy)
{
  const HlModel *model = solution->model;
  const char *kind = hl_plant_component (solution->plant, (guint) c)->kind->id;
  HlShaftRole role = hl_plant_component (solution->plant, (guint) c)->kind->shaft;
  gboolean is_cooled = hl_model_port_node (model, c, "cooling_inlet") >= 0;
  if (g_str_equal (kind, "heat_input") || g_str_equal (kind, "boiler")
      || (g_str_equal (kind, "evaporator") && hl_model_port_node (model, c, "hot_inlet") < 0))
    book (energy, own (solution, c, "heat"));
  else if (role == HL_SHAFT_DRIVES)
    book (energy, -own (solution, c, "internal_power"));
  else if (g_str_equal (kind, "solar_field"))
    book (energy, own (solution, c, "heat"));
  else if (role == HL_SHAFT_DRIVEN)
    book (energy, own (solution, c, "power"));
  else if (hl_model_own_var (model, c, "heat_loss") >= 0)
    book (energy, -own (solution, c, "heat_loss"));
  else if ((g_str_equal (kind, "condenser") && !is_cooled) || g_str_equal (kind, "air_condenser") || g_str_equal (kind, "cooling_tower")
           || (g_str_equal (kind, "district_heater") && hl_model_port_node (model, c, "water_inlet") < 0))
    book (energy, -own (solution, c, "heat"));
  else if (g_str_equal (kind, "steam_user"))
    {
      int out = hl_model_port_node (model, c, "condensate");
      book (mass, -own (solution, c, "lost_flow"));
      book (energy, -own (solution, c, "heat"));
      if (out >= 0)
        book (energy, -own (solution, c, "lost_flow") * solution->states[out].st.h);
    }
  else if (g_str_equal (kind, "open_heater"))
    {
      book (mass, -own (solution, c, "vent_flow"));
      book (energy, -own (solution, c, "vent_flow") * own (solution, c, "vent_h"));
    }
  else if (is_open_door (kind))
    for (int k = model->first_port[c]; k < model->first_port[c + 1]; k++)
      {
        const HlPortNode *port = &g_array_index (model->ports, HlPortNode, k);
        const HlNodeResult *node = &solution->states[port->node];
        book (mass, port->is_out ? node->m : -node->m);
        book (energy, (port->is_out ? 1.0 : -1.0) * node->m * node->st.h);
      }
}

/* The plant's balance over its doors, and the worst of its components' own, whichever is larger. */
void
hl_solution_balances (const HlSolution *solution, double *mass, double *energy)
{
  g_return_if_fail (solution != NULL);
  const HlModel *model = solution->model;
  Balance plant_mass = { 0.0, 0.0 }, plant_energy = { 0.0, 0.0 };
  double worst = 0.0, largest = 0.0;
  for (guint k = 0; k < model->nodes->len; k++)
    largest = fmax (largest, fabs (solution->states[k].m));
  plant_mass.largest = largest;
  for (guint c = 0; c < hl_plant_n_components (solution->plant); c++)
    {
      double sum = 0.0;
      book_doors (solution, (int) c, &plant_mass, &plant_energy);
      const char *kind = hl_plant_component (solution->plant, c)->kind->id;
      if (is_open_door (kind))
        continue;
      for (int k = model->first_port[c]; k < model->first_port[c + 1]; k++)
        {
          const HlPortNode *port = &g_array_index (model->ports, HlPortNode, k);
          sum += (port->is_out ? -1.0 : 1.0) * solution->states[port->node].m;
        }
      sum -= own (solution, (int) c, "lost_flow") + own (solution, (int) c, "vent_flow");
      if (largest > 0.0 && fabs (sum) / largest > fabs (worst))
        worst = sum / largest;
    }
  double total = relative (&plant_mass);
  *mass = fabs (total) > fabs (worst) ? total : worst;
  *energy = relative (&plant_energy);
}
