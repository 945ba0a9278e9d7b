/* From a solution to the plain cycle that the diagram shows.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "draw/state-diagram-private.h"
#include <math.h>

static gboolean
is_drawable (const HlState *state)
{
  return isfinite (state->p) && isfinite (state->T) && isfinite (state->h) && isfinite (state->s) && state->p > 0.0;
}

/* Marks the streams that only a service circuit knows, such as cooling water. */
static void
add_processes (HlCycle *cycle, const HlSolution *solution, gboolean *is_service, guint n_streams)
{
  g_autofree gboolean *is_cycle = g_new0 (gboolean, n_streams + 1);
  for (guint i = 0; i < hl_solution_n_processes (solution); i++)
    {
      HlProcess process = *hl_solution_process (solution, i);
      const int ends[2] = { process.from_stream, process.to_stream };
      for (int k = 0; k < 2; k++)
        if (ends[k] >= 0 && (guint) ends[k] < n_streams)
          (process.is_service ? is_service : is_cycle)[ends[k]] = TRUE;
      if (process.is_service || process.fluid != cycle->fluid || !is_drawable (&process.from) || !is_drawable (&process.to))
        continue;
      process.has_isentropic = process.has_isentropic && is_drawable (&process.isentropic);
      g_array_append_val (cycle->processes, process);
    }
  for (guint i = 0; i < n_streams; i++)
    is_service[i] = is_service[i] && !is_cycle[i];
}

/* The medium whose cycle the diagram is about: of the expansion that gives most power, without one of the compression that takes most; water
 * where nothing turns.  A gas has no dome to be drawn in. */
static const HlFluid *
main_fluid (const HlSolution *solution)
{
  const HlFluid *fluid = NULL;
  double most = 0.0;
  for (int is_compression = 0; is_compression <= 1 && fluid == NULL; is_compression++)
    for (guint i = 0; i < hl_solution_n_processes (solution); i++)
      {
        const HlProcess *process = hl_solution_process (solution, i);
        double power = process->m * fabs (process->from.h - process->to.h);
        if (process->kind != (is_compression ? HL_PROCESS_COMPRESSION : HL_PROCESS_EXPANSION) || process->is_service || process->fluid == NULL
            || !hl_fluid_has_dome (process->fluid))
          continue;
        if (fluid == NULL || power > most)
          {
            fluid = process->fluid;
            most = power;
          }
      }
  return fluid;
}

HlCycle *
hl_cycle_from_solution (const HlSolution *solution, HlUnitSet units)
{
  const HlPlant *plant = hl_solution_plant (solution);
  guint n_streams = hl_plant_n_streams (plant);
  g_autofree gboolean *is_service = g_new0 (gboolean, n_streams + 1);
  HlCycle *cycle = hl_cycle_new (main_fluid (solution), units);
  add_processes (cycle, solution, is_service, n_streams);
  for (guint i = 0; i < n_streams; i++)
    {
      HlStreamResult result;
      HlCyclePoint point = { .id = hl_plant_stream (plant, i)->id, .stream = (int) i, .m = NAN };
      hl_solution_stream (solution, i, &result);
      if (is_service[i] || !result.has_state || result.fluid != cycle->fluid || !is_drawable (&result.state))
        continue;
      point.state = result.state;
      if (result.has_flow)
        point.m = result.m;
      g_array_append_val (cycle->points, point);
    }
  return cycle;
}

HlStateDiagram *
hl_state_diagram_new (const HlSolution *solution, HlUnitSet units, double width, double height)
{
  return hl_state_diagram_new_of_kind (solution, HL_STATE_DIAGRAM_TS, units, width, height);
}

HlStateDiagram *
hl_state_diagram_new_of_kind (const HlSolution *solution, HlStateDiagramKind kind, HlUnitSet units, double width, double height)
{
  return hl_state_diagram_new_with (solution, kind, 0, units, width, height);
}

HlStateDiagram *
hl_state_diagram_new_with (const HlSolution *solution, HlStateDiagramKind kind, guint extras, HlUnitSet units, double width, double height)
{
  g_autoptr (HlCycle) cycle = NULL;
  g_return_val_if_fail (solution != NULL && kind < HL_N_STATE_DIAGRAMS, NULL);
  cycle = hl_cycle_from_solution (solution, units);
  cycle->kind = kind;
  cycle->extras = extras;
  hl_cycle_add_sources (cycle, solution);
  return hl_state_diagram_from_cycle (cycle, width, height);
}

HlStateDiagram *
hl_state_diagram_new_on (const HlSolution *solution, const HlStateDiagram *other)
{
  g_autoptr (HlCycle) cycle = NULL;
  g_return_val_if_fail (solution != NULL && other != NULL, NULL);
  cycle = hl_cycle_from_solution (solution, other->x_axis.units);
  cycle->kind = other->kind;
  cycle->extras = other->extras;
  hl_cycle_add_sources (cycle, solution);
  return hl_state_diagram_from_cycle_on (cycle, other, other->width, other->height);
}
