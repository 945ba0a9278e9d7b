/* Circuits: connected parts of the mass-balance graph; the two sides of an exchanger are two.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "engine/circuits.h"
#include "plant/circuit.h"

static int
find (int *circuits, int node)
{
  while (circuits[node] != node)
    node = circuits[node] = circuits[circuits[node]];
  return node;
}

/* Nodes at the connected ports of a component. */
static int
nodes_of (const HlModel *model, int component, int *nodes, int *sides, int most)
{
  const HlKind *kind = hl_plant_component (model->plant, (guint) component)->kind;
  int n = 0;
  for (int k = model->first_port[component]; k < model->first_port[component + 1] && n < most; k++)
    {
      const HlPortNode *port = &g_array_index (model->ports, HlPortNode, k);
      sides[n] = hl_kind_side_of_port (kind, port->key);
      nodes[n++] = port->node;
    }
  return n;
}

int *
hl_circuits (const HlModel *model)
{
  int *circuits = g_new (int, model->nodes->len + 1), nodes[64];
  int sides[64];
  for (guint k = 0; k < model->nodes->len; k++)
    circuits[k] = (int) k;
  for (guint c = 0; c < hl_plant_n_components (model->plant); c++)
    {
      int n = nodes_of (model, (int) c, nodes, sides, 64);
      for (int a = 0; a < n; a++)
        for (int b = a + 1; b < n; b++)
          if (sides[a] == sides[b])
            circuits[find (circuits, nodes[b])] = find (circuits, nodes[a]);
    }
  for (guint k = 0; k < model->nodes->len; k++)
    circuits[k] = find (circuits, (int) k);
  return circuits;
}

gboolean
hl_circuits_shared (const HlModel *model, const int *circuits, int a, int b)
{
  int nodes_a[64], nodes_b[64];
  int sides[64];
  int n_a = nodes_of (model, a, nodes_a, sides, 64), n_b = nodes_of (model, b, nodes_b, sides, 64);
  for (int i = 0; i < n_a; i++)
    for (int j = 0; j < n_b; j++)
      if (circuits[nodes_a[i]] == circuits[nodes_b[j]])
        return TRUE;
  return FALSE;
}

gboolean *
hl_circuits_service (const HlModel *model, const int *circuits)
{
  guint n = model->nodes->len;
  gboolean *is_service = g_new0 (gboolean, n + 1);
  g_autofree gboolean *is_cooling = g_new0 (gboolean, n + 1), *is_working = g_new0 (gboolean, n + 1);
  for (guint c = 0; c < hl_plant_n_components (model->plant); c++)
    {
      gboolean is_turbine = hl_plant_component (model->plant, c)->kind->shaft == HL_SHAFT_DRIVES;
      for (int k = model->first_port[c]; k < model->first_port[c + 1]; k++)
        {
          const HlPortNode *port = &g_array_index (model->ports, HlPortNode, k);
          if (g_str_equal (port->key, "cooling_inlet") || g_str_equal (port->key, "cooling_outlet")
              || g_str_equal (port->key, "water_inlet") || g_str_equal (port->key, "water_outlet")
              || g_str_equal (port->key, "gas_inlet") || g_str_equal (port->key, "gas_outlet")
              || g_str_equal (port->key, "air_inlet") || g_str_equal (port->key, "air_outlet"))
            is_cooling[circuits[port->node]] = TRUE;
          else if (is_turbine)
            is_working[circuits[port->node]] = TRUE;
        }
    }
  for (guint k = 0; k < n; k++)
    is_service[k] = is_cooling[circuits[k]] && !is_working[circuits[k]];
  return is_service;
}
