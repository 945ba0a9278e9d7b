/* Stands in for the solver where a test of pictures needs known states: its functions take the place of the library's.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "solution-fixture.h"
#include <string.h>

struct _HlSolution {
  gatomicrefcount ref_count;
  HlPlant        *plant;
  gboolean        is_solved;
  HlStreamResult *results;
};

static HlStatus
state_from (const HlComponent *from, const char *port, HlState *state)
{
  const HlFluid *water = hl_fluid_water ();
  const char *kind = from->kind->id;
  if (g_str_equal (kind, "boiler") || g_str_equal (kind, "heat_input"))
    return hl_fluid_state_pT (water, 65e5, 758.15, state);
  if (g_str_equal (kind, "turbine"))
    return g_str_equal (port, "exhaust") ? hl_fluid_state_px (water, 7000.0, 0.884, state)
         : g_str_equal (port, "extraction1") ? hl_fluid_state_pT (water, 6e5, 483.15, state)
         : hl_fluid_state_px (water, 2.5e5, 0.98, state);
  if (g_str_equal (kind, "condenser"))
    return g_str_equal (port, "cooling_outlet") ? hl_fluid_state_pT (water, 2e5, 298.15, state)
         : hl_fluid_state_px (water, 7000.0, 0.0, state);
  if (g_str_equal (kind, "boundary") || g_str_equal (kind, "make_up"))
    return hl_fluid_state_pT (water, 2e5, 288.15, state);
  return hl_fluid_state_pT (water, 71e5, 401.15, state);
}

HlSolution *
hl_fixture_solution (HlPlant *plant, gboolean is_solved)
{
  HlSolution *solution = g_new0 (HlSolution, 1);
  g_atomic_ref_count_init (&solution->ref_count);
  solution->plant = hl_plant_ref (plant);
  solution->is_solved = is_solved;
  solution->results = g_new0 (HlStreamResult, hl_plant_n_streams (plant) + 1);
  for (guint i = 0; i < hl_plant_n_streams (plant); i++)
    {
      const HlStream *stream = hl_plant_stream (plant, i);
      HlStreamResult *result = &solution->results[i];
      result->has_flow = TRUE;
      result->m = 16.67 - 1.37 * (i % 7);
      result->fluid = hl_fluid_water ();
      result->has_state = state_from (hl_plant_find_component (plant, stream->from_id), stream->from_port, &result->state) == HL_OK;
      g_assert_true (result->has_state);
    }
  return solution;
}

HlSolution *
hl_solution_ref (HlSolution *solution)
{
  g_atomic_ref_count_inc (&solution->ref_count);
  return solution;
}

void
hl_solution_unref (HlSolution *solution)
{
  if (solution == NULL || !g_atomic_ref_count_dec (&solution->ref_count))
    return;
  hl_plant_unref (solution->plant);
  g_free (solution->results);
  g_free (solution);
}

HlPlant *
hl_solution_plant (const HlSolution *solution)
{
  return solution->plant;
}

gboolean
hl_solution_is_solved (const HlSolution *solution)
{
  return solution->is_solved;
}

void
hl_solution_stream (const HlSolution *solution, guint stream, HlStreamResult *result)
{
  g_assert_cmpuint (stream, <, hl_plant_n_streams (solution->plant));
  *result = solution->results[stream];
}

gboolean
hl_solution_value (const HlSolution *solution, const HlAddress *address, double *value)
{
  (void) solution;
  if (!g_str_equal (address->key, "power") && !g_str_equal (address->key, "heat"))
    return FALSE;
  *value = address->id[0] == 'P' ? 124e3 : 14.89e6;
  return TRUE;
}

guint
hl_solution_n_results (const HlSolution *solution)
{
  (void) solution;
  return 3;
}

const HlQuantityKind *
hl_solution_result (const HlSolution *solution, guint n, double *value)
{
  static const struct { const char *key; double value; } results[] = {
    { "net_power", 13.7e6 }, { "heat_input", 50.2e6 }, { "cycle_efficiency", 0.2521 } };
  (void) solution;
  *value = results[n].value;
  return hl_plant_quantity_lookup (results[n].key);
}

guint
hl_solution_n_processes (const HlSolution *solution)
{
  (void) solution;
  return 0;
}

const HlProcess *
hl_solution_process (const HlSolution *solution, guint n)
{
  (void) solution;
  (void) n;
  g_assert_not_reached ();
}
