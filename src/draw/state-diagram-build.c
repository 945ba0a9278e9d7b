/* From a cycle to the lines of its temperature-entropy diagram: axes, dome, process paths.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "draw/state-diagram-private.h"
#include "draw/text.h"
#include <math.h>

typedef struct { double low, high; } Range;

static void
range_take (Range *range, double value)
{
  if (!isfinite (value))
    return;
  range->low = MIN (range->low, value);
  range->high = MAX (range->high, value);
}

static void
cycle_ranges (const HlCycle *cycle, Range *s, Range *T)
{
  *s = *T = (Range) { G_MAXDOUBLE, -G_MAXDOUBLE };
  for (guint i = 0; i < cycle->points->len; i++)
    {
      const HlState *state = &g_array_index (cycle->points, HlCyclePoint, i).state;
      range_take (s, state->s);
      range_take (T, state->T);
    }
  for (guint i = 0; i < cycle->processes->len; i++)
    {
      const HlProcess *process = &g_array_index (cycle->processes, HlProcess, i);
      range_take (s, process->from.s);
      range_take (T, process->from.T);
      range_take (s, process->to.s);
      range_take (T, process->to.T);
      if (process->has_isentropic)
        range_take (T, process->isentropic.T);
    }
}

/* Shows the cycle, the dome from somewhat below the coldest state to its top, and air above the hottest state. */
void
hl_state_diagram_set_axes (HlStateDiagram *diagram, const HlCycle *cycle)
{
  const HlDome *dome = diagram->dome;
  double size = diagram->text_size, left = hl_plot_axis_room_left (size), below = hl_plot_axis_room_below (size);
  double right = 1.3 * size, above = 0.8 * size, T_critical, T_triple, coldest, share;
  Range s, T;
  HlFluidLimits limits;
  hl_fluid_limits (cycle->fluid, &limits);
  T_critical = limits.T_critical;
  T_triple = limits.T_triple;
  cycle_ranges (cycle, &s, &T);
  if (!(T.low < T.high))
    T = (Range) { MAX (T_triple + 30.0, 0.45 * T_critical), T_critical };
  coldest = T.low;
  range_take (&T, T_critical + 0.05 * (T_critical - T.low));
  T.low = MAX (T.low - 0.12 * (T.high - T.low), MIN (T.low, T_triple));
  /* Above the hottest state there is room for the name of its isobar. */
  share = MIN (2.4 * size / MAX (diagram->height - above - below, 1.0), 0.2);
  T.high = (T.high - share * T.low) / (1.0 - share);
  range_take (&s, hl_dome_entropy (dome, T.low, 0.0));
  range_take (&s, hl_dome_entropy (dome, coldest, 1.0));
  s.high += 0.045 * (s.high - s.low);
  diagram->frame = (HlBox) { left, above, MAX (diagram->width - left - right, 20.0), MAX (diagram->height - above - below, 20.0) };
  /* Figures stand clear of each other, and no more than a dozen of them. */
  hl_plot_axis_set (&diagram->s_axis, HL_DIMENSION_ENTROPY, cycle->units, s.low, s.high,
                    diagram->frame.x, diagram->frame.x + diagram->frame.width, MAX (5.2 * size, diagram->frame.width / 10.0));
  hl_plot_axis_set (&diagram->T_axis, HL_DIMENSION_TEMPERATURE, cycle->units, T.low, T.high,
                    diagram->frame.y + diagram->frame.height, diagram->frame.y, MAX (2.5 * size, diagram->frame.height / 12.0));
}

/* The dome's table is finer than a dotted line needs: points a few pixels apart will do. */
static void
add_quality_line (HlStateDiagram *diagram, double quality)
{
  const HlDome *dome = diagram->dome;
  HlPlotSeries *series = hl_plot_series_new (HL_PLOT_QUIET, HL_PLOT_DOTTED, 0.75);
  double last = -G_MAXDOUBLE;
  for (guint i = 0; i < dome->n; i++)
    {
      double along = fabs (hl_plot_axis_to_pixel (&diagram->T_axis, dome->T[i]) - diagram->T_axis.pixel_low);
      double s = dome->s_liquid[i] + quality * (dome->s_vapour[i] - dome->s_liquid[i]);
      if (fabs (along - last) < 5.0 && i % 8 != 0 && i + 1 < dome->n)
        continue;
      hl_plot_series_add (series, s, dome->T[i]);
      last = along;
    }
  hl_plot_layer_add (diagram->background, series);
}

void
hl_state_diagram_add_dome (HlStateDiagram *diagram)
{
  const HlDome *dome = diagram->dome;
  diagram->outline = hl_plot_series_new (HL_PLOT_OUTLINE, HL_PLOT_SOLID, 1.3);
  for (guint i = 0; i < dome->n; i++)
    hl_plot_series_add (diagram->outline, dome->s_liquid[i], dome->T[i]);
  for (guint i = dome->n; i-- > 0;)
    hl_plot_series_add (diagram->outline, dome->s_vapour[i], dome->T[i]);
  for (int tenth = 1; tenth <= 9; tenth++)
    add_quality_line (diagram, tenth / 10.0);
}

static HlPlotColour
colour_of (HlLook look)
{
  return look == HL_LOOK_WATER ? HL_PLOT_WATER : look == HL_LOOK_WET ? HL_PLOT_WET : HL_PLOT_STEAM;
}

static double
largest_flow (const HlCycle *cycle)
{
  double m = 0.0;
  for (guint i = 0; i < cycle->processes->len; i++)
    m = fmax (m, g_array_index (cycle->processes, HlProcess, i).m);
  return m;
}

/* Main flow bold, side flows finer; what has no flow yet counts as a side flow. */
static double
line_width (const HlProcess *process, double largest)
{
  double share = largest > 0.0 && process->m > 0.0 ? process->m / largest : 0.0;
  if (process->kind == HL_PROCESS_MIXING)
    return 1.0;
  return 1.25 + 1.25 * sqrt (CLAMP (share, 0.0, 1.0));
}

static double
length_of (const HlStateDiagram *diagram, const HlState *a, const HlState *b)
{
  return hypot (hl_plot_axis_to_pixel (&diagram->s_axis, b->s) - hl_plot_axis_to_pixel (&diagram->s_axis, a->s),
                hl_plot_axis_to_pixel (&diagram->T_axis, b->T) - hl_plot_axis_to_pixel (&diagram->T_axis, a->T));
}

static HlPlotDash
dash_of (const HlStateDiagram *diagram, const HlProcess *process)
{
  switch (process->kind)
    {
    case HL_PROCESS_EXPANSION:
    case HL_PROCESS_THROTTLING:
      return HL_PLOT_DASHED;
    case HL_PROCESS_COMPRESSION:
      /* A pump is a few pixels high: dashes would leave nothing of it. */
      return length_of (diagram, &process->from, &process->to) > 14.0 ? HL_PLOT_DASHED : HL_PLOT_SOLID;
    default:
      return HL_PLOT_SOLID;
    }
}

/* One series for each stretch of one colour; neighbours share their point. */
static void
add_path (HlStateDiagram *diagram, const HlProcess *process, double width)
{
  GArray *path = hl_process_path (process, &diagram->s_axis, &diagram->T_axis);
  HlPlotSeries *series = NULL;
  HlLook look = HL_LOOK_UNKNOWN;
  for (guint i = 0; i + 1 < path->len; i++)
    {
      const HlPathPoint *a = &g_array_index (path, HlPathPoint, i), *b = &g_array_index (path, HlPathPoint, i + 1);
      /* The ends of the saturation line count as one-phase: a stretch that starts there is what it leads to. */
      HlLook here = a->look == HL_LOOK_WET || b->look == HL_LOOK_WET ? HL_LOOK_WET : b->look;
      if (series == NULL || here != look)
        {
          series = hl_plot_series_new (colour_of (here), dash_of (diagram, process), width);
          hl_plot_layer_add (diagram->paths, series);
          hl_plot_series_add (series, a->s, a->T);
          look = here;
        }
      hl_plot_series_add (series, b->s, b->T);
    }
  g_array_unref (path);
}

static void
add_ideal_drop (HlStateDiagram *diagram, const HlProcess *process)
{
  HlPlotSeries *series;
  if (!process->has_isentropic || length_of (diagram, &process->to, &process->isentropic) < 5.0)
    return;
  series = hl_plot_series_new (HL_PLOT_QUIET, HL_PLOT_DOTTED, 1.3);
  hl_plot_series_add (series, process->from.s, process->from.T);
  hl_plot_series_add (series, process->isentropic.s, process->isentropic.T);
  hl_plot_layer_add (diagram->paths, series);
}

void
hl_state_diagram_add_paths (HlStateDiagram *diagram, const HlCycle *cycle)
{
  double largest = largest_flow (cycle);
  for (guint i = 0; i < cycle->processes->len; i++)
    add_ideal_drop (diagram, &g_array_index (cycle->processes, HlProcess, i));
  /* Side flows first, so that the main flow lies on top. */
  for (int is_main = 0; is_main <= 1; is_main++)
    for (guint i = 0; i < cycle->processes->len; i++)
      {
        const HlProcess *process = &g_array_index (cycle->processes, HlProcess, i);
        double width = line_width (process, largest);
        if ((width > 2.0) == is_main)
          add_path (diagram, process, width);
      }
}

static void
clear_text (gpointer text)
{
  g_free (((HlDiagramText *) text)->text);
}

/* Where a small picture has no room for every number, states share dots from farther away: better a dot with three
 * numbers than one without. */
static void
add_marks_and_texts (HlStateDiagram *diagram, const HlCycle *cycle)
{
  guint n_background = hl_plot_layer_n (diagram->background);
  for (double within = 0.6; ; within *= 1.3)
    {
      hl_state_diagram_add_marks (diagram, cycle, within * diagram->number_size);
      if (hl_state_diagram_add_texts (diagram, cycle) || within > 1.5 || cycle->points->len > 100)
        return;
      hl_state_diagram_clear_marks (diagram);
      g_array_set_size (diagram->texts, 0);
      g_array_set_size (diagram->gaps, 0);
      g_ptr_array_set_size (diagram->background->series, (int) n_background);
    }
}

HlStateDiagram *
hl_state_diagram_from_cycle (const HlCycle *cycle, double width, double height)
{
  HlStateDiagram *diagram = g_new0 (HlStateDiagram, 1);
  double scale;
  diagram->width = MAX (width, 60.0);
  diagram->height = MAX (height, 60.0);
  scale = CLAMP (sqrt (diagram->width * diagram->height / (960.0 * 600.0)), 0.9, 1.3);
  diagram->text_size = 10.5 * scale;
  diagram->number_size = 11.5 * scale;
  diagram->dome = hl_dome_of (cycle->fluid);
  diagram->background = hl_plot_layer_new ();
  diagram->paths = hl_plot_layer_new ();
  diagram->marks = g_array_new (FALSE, TRUE, sizeof (HlMark));
  diagram->texts = g_array_new (FALSE, TRUE, sizeof (HlDiagramText));
  g_array_set_clear_func (diagram->texts, clear_text);
  diagram->gaps = g_array_new (FALSE, TRUE, sizeof (HlBox));
  hl_state_diagram_set_axes (diagram, cycle);
  hl_state_diagram_add_dome (diagram);
  hl_state_diagram_add_paths (diagram, cycle);
  add_marks_and_texts (diagram, cycle);
  return diagram;
}
