/* The temperature-entropy diagram of a solution: what goes in, and where things lie for the pointer.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "draw/state-diagram-private.h"
#include <math.h>

HlCycle *
hl_cycle_new (const HlFluid *fluid, HlUnitSet units)
{
  HlCycle *cycle = g_new0 (HlCycle, 1);
  cycle->fluid = fluid != NULL ? fluid : hl_fluid_water ();
  cycle->units = units;
  cycle->points = g_array_new (FALSE, TRUE, sizeof (HlCyclePoint));
  cycle->processes = g_array_new (FALSE, TRUE, sizeof (HlProcess));
  return cycle;
}

void
hl_cycle_free (HlCycle *cycle)
{
  if (cycle == NULL)
    return;
  g_array_unref (cycle->points);
  g_array_unref (cycle->processes);
  g_free (cycle);
}

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

HlCycle *
hl_cycle_from_solution (const HlSolution *solution, HlUnitSet units)
{
  const HlPlant *plant = hl_solution_plant (solution);
  guint n_streams = hl_plant_n_streams (plant);
  g_autofree gboolean *is_service = g_new0 (gboolean, n_streams + 1);
  HlCycle *cycle = hl_cycle_new (NULL, units);
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
  g_autoptr (HlCycle) cycle = NULL;
  g_return_val_if_fail (solution != NULL, NULL);
  cycle = hl_cycle_from_solution (solution, units);
  return hl_state_diagram_from_cycle (cycle, width, height);
}

void
hl_state_diagram_free (HlStateDiagram *diagram)
{
  if (diagram == NULL)
    return;
  for (guint i = 0; i < diagram->marks->len; i++)
    {
      HlMark *mark = &g_array_index (diagram->marks, HlMark, i);
      g_free (mark->streams);
      g_free (mark->text);
    }
  for (guint i = 0; i < diagram->texts->len; i++)
    g_free (g_array_index (diagram->texts, HlDiagramText, i).text);
  g_array_unref (diagram->marks);
  g_array_unref (diagram->texts);
  g_array_unref (diagram->gaps);
  hl_plot_series_free (diagram->outline);
  hl_plot_layer_free (diagram->background);
  hl_plot_layer_free (diagram->paths);
  g_free (diagram);
}

static gboolean
is_in_box (const HlBox *box, double x, double y)
{
  return x >= box->x && x <= box->x + box->width && y >= box->y && y <= box->y + box->height;
}

int
hl_state_diagram_stream_at (const HlStateDiagram *diagram, double x, double y, double within)
{
  double nearest = within;
  int stream = -1;
  g_return_val_if_fail (diagram != NULL, -1);
  for (guint i = 0; i < diagram->marks->len; i++)
    {
      const HlMark *mark = &g_array_index (diagram->marks, HlMark, i);
      /* Distance from the dot's rim; a number answers for its dot. */
      double distance = MAX (0.0, hypot (mark->at.x - x, mark->at.y - y) - mark->radius);
      if (mark->label.is_placed && is_in_box (&mark->label.box, x, y))
        distance = 0.0;
      if (mark->kind != HL_MARK_STATE || !(distance <= nearest) || (stream >= 0 && !(distance < nearest)))
        continue;
      nearest = distance;
      stream = mark->streams[0];
    }
  return stream;
}

gboolean
hl_state_diagram_to_state (const HlStateDiagram *diagram, double x, double y, double *s, double *T)
{
  g_return_val_if_fail (diagram != NULL, FALSE);
  if (!is_in_box (&diagram->frame, x, y))
    return FALSE;
  *s = hl_plot_axis_from_pixel (&diagram->s_axis, x);
  *T = hl_plot_axis_from_pixel (&diagram->T_axis, y);
  return TRUE;
}

void
hl_state_diagram_to_pixel (const HlStateDiagram *diagram, double s, double T, double *x, double *y)
{
  g_return_if_fail (diagram != NULL);
  *x = hl_plot_axis_to_pixel (&diagram->s_axis, s);
  *y = hl_plot_axis_to_pixel (&diagram->T_axis, T);
}
