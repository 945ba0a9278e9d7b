/* State diagrams: what it is made from, and where things lie for the pointer.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "draw/state-diagram-private.h"
#include "plant/i18n.h"
#include <math.h>
#include <string.h>

static const struct { const char *id, *sign, *title; HlDimension across, up; } kinds[HL_N_STATE_DIAGRAMS] = {
  [HL_STATE_DIAGRAM_TS] = { "ts", "T-s", N_("Temperature-entropy diagram"), HL_DIMENSION_ENTROPY, HL_DIMENSION_TEMPERATURE },
  [HL_STATE_DIAGRAM_HS] = { "hs", "h-s", N_("Enthalpy-entropy diagram"), HL_DIMENSION_ENTROPY, HL_DIMENSION_ENTHALPY },
  [HL_STATE_DIAGRAM_PH] = { "ph", "p-h", N_("Pressure-enthalpy diagram"), HL_DIMENSION_ENTHALPY, HL_DIMENSION_PRESSURE },
};

const char *
hl_state_diagram_sign (HlStateDiagramKind kind)
{
  return kinds[kind].sign;
}

const char *
hl_state_diagram_id (HlStateDiagramKind kind)
{
  return kinds[kind].id;
}

const char *
hl_state_diagram_title (HlStateDiagramKind kind)
{
  return _(kinds[kind].title);
}

gboolean
hl_state_diagram_kind_from_id (const char *id, HlStateDiagramKind *kind)
{
  for (guint i = 0; i < HL_N_STATE_DIAGRAMS; i++)
    if (strcmp (kinds[i].id, id) == 0)
      {
        *kind = (HlStateDiagramKind) i;
        return TRUE;
      }
  return FALSE;
}

void
hl_state_diagram_dimensions (HlStateDiagramKind kind, HlDimension *across, HlDimension *up)
{
  *across = kinds[kind].across;
  *up = kinds[kind].up;
}

HlCycle *
hl_cycle_new (const HlFluid *fluid, HlUnitSet units)
{
  HlCycle *cycle = g_new0 (HlCycle, 1);
  cycle->fluid = fluid != NULL ? fluid : hl_fluid_water ();
  cycle->units = units;
  cycle->points = g_array_new (FALSE, TRUE, sizeof (HlCyclePoint));
  cycle->processes = g_array_new (FALSE, TRUE, sizeof (HlProcess));
  cycle->sources = g_ptr_array_new_with_free_func ((GDestroyNotify) hl_plot_series_free);
  return cycle;
}

void
hl_cycle_free (HlCycle *cycle)
{
  if (cycle == NULL)
    return;
  g_array_unref (cycle->points);
  g_array_unref (cycle->processes);
  g_ptr_array_unref (cycle->sources);
  g_free (cycle);
}

void
hl_state_diagram_free (HlStateDiagram *diagram)
{
  if (diagram == NULL)
    return;
  hl_state_diagram_clear_marks (diagram);
  g_ptr_array_unref (diagram->areas);
  hl_state_table_clear (&diagram->table);
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
hl_state_diagram_to_state (const HlStateDiagram *diagram, double x, double y, double *across, double *up)
{
  g_return_val_if_fail (diagram != NULL, FALSE);
  if (!is_in_box (&diagram->frame, x, y))
    return FALSE;
  *across = hl_plot_axis_from_pixel (&diagram->x_axis, x);
  *up = hl_plot_axis_from_pixel (&diagram->y_axis, y);
  return TRUE;
}

void
hl_state_diagram_to_pixel (const HlStateDiagram *diagram, double across, double up, double *x, double *y)
{
  g_return_if_fail (diagram != NULL);
  *x = hl_plot_axis_to_pixel (&diagram->x_axis, across);
  *y = hl_plot_axis_to_pixel (&diagram->y_axis, up);
}
