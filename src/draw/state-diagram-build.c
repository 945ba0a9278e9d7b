/* From a cycle to the lines of its state diagram: axes, dome, process paths.
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
  for (guint i = 0; i < cycle->sources->len; i++)
    for (guint k = 0; k < hl_plot_series_n (cycle->sources->pdata[i]); k++)
      range_take (T, hl_plot_series_point (cycle->sources->pdata[i], k)->y);
}

/* Shows the cycle, the dome from somewhat below the coldest state to its top, and air above the hottest state. */
static void
ranges_of_ts (const HlStateDiagram *diagram, const HlCycle *cycle, double text_share, Range *across, Range *up)
{
  const HlDome *dome = diagram->dome;
  double T_critical, T_triple, coldest;
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
  T.high = (T.high - text_share * T.low) / (1.0 - text_share);
  range_take (&s, hl_dome_entropy (dome, T.low, 0.0));
  range_take (&s, hl_dome_entropy (dome, coldest, 1.0));
  /* The dome of a dry medium leans over its lower end. */
  for (guint i = 0; i < dome->n; i++)
    if (dome->T[i] >= coldest)
      range_take (&s, dome->s_vapour[i]);
  s.high += 0.045 * (s.high - s.low);
  *across = s;
  *up = T;
}

/* The coldest temperature that the saturation line is shown down to. */
static double
coldest_shown (const HlDome *dome, const HlCycle *cycle, double least)
{
  double T = G_MAXDOUBLE;
  for (guint i = 0; i < cycle->points->len; i++)
    T = MIN (T, g_array_index (cycle->points, HlCyclePoint, i).state.T);
  for (guint i = 0; i < cycle->processes->len; i++)
    T = MIN (T, MIN (g_array_index (cycle->processes, HlProcess, i).from.T, g_array_index (cycle->processes, HlProcess, i).to.T));
  return T < G_MAXDOUBLE ? CLAMP (T, dome->T[0], least) : least;
}

static void
take_state (const HlStateDiagram *diagram, const HlState *state, Range *across, Range *up)
{
  HlPoint at = hl_axes_state (diagram->kind, state);
  range_take (across, at.x);
  range_take (up, at.y);
}

/* The states, and the saturation line from the coldest of them to the critical point. */
static void
ranges_of_states (const HlStateDiagram *diagram, const HlCycle *cycle, Range *across, Range *up)
{
  const HlDome *dome = diagram->dome;
  double T_top = dome->T[dome->n - 1], coldest = coldest_shown (dome, cycle, dome->T[0] + 0.25 * (T_top - dome->T[0]));
  *across = *up = (Range) { G_MAXDOUBLE, -G_MAXDOUBLE };
  for (guint i = 0; i < cycle->points->len; i++)
    take_state (diagram, &g_array_index (cycle->points, HlCyclePoint, i).state, across, up);
  for (guint i = 0; i < cycle->processes->len; i++)
    {
      const HlProcess *process = &g_array_index (cycle->processes, HlProcess, i);
      take_state (diagram, &process->from, across, up);
      take_state (diagram, &process->to, across, up);
      if (process->has_isentropic)
        take_state (diagram, &process->isentropic, across, up);
    }
  for (int step = 0; step <= 24; step++)
    for (int side = 0; side <= 1; side++)
      {
        HlPoint at = hl_dome_point (dome, diagram->kind, coldest + step / 24.0 * (T_top - coldest), side);
        range_take (across, at.x);
        range_take (up, at.y);
      }
}

/* Room beside the first state, but none below a zero where the axis may begin. */
static void
widen_left (Range *range)
{
  if (range->low > 0.0)
    range->low = MAX (0.0, range->low - 0.01 * (range->high - range->low));
}

static void
ranges_of_hs (const HlStateDiagram *diagram, const HlCycle *cycle, double text_share, Range *s, Range *h)
{
  ranges_of_states (diagram, cycle, s, h);
  widen_left (s);
  h->low -= 0.03 * (h->high - h->low);
  h->high = (h->high - text_share * h->low) / (1.0 - text_share);
  s->high += 0.07 * (s->high - s->low);
}

/* Room above for what lies over the critical point, and below for the names of the isotherms. */
static void
ranges_of_ph (const HlStateDiagram *diagram, const HlCycle *cycle, double text_share, Range *h, Range *p)
{
  double decades;
  ranges_of_states (diagram, cycle, h, p);
  widen_left (h);
  decades = log (p->high / p->low);
  p->low = MAX (p->low * exp (-(0.06 + text_share) * decades), MIN (p->low, diagram->dome->p[0]));
  p->high *= exp (0.05 * decades);
  h->high += 0.06 * (h->high - h->low);
}

void
hl_state_diagram_set_axes (HlStateDiagram *diagram, const HlCycle *cycle)
{
  double size = diagram->text_size, left = hl_plot_axis_room_left (size), below = hl_plot_axis_room_below (size);
  double right = 1.3 * size + diagram->panel, above = 0.8 * size, text_share = MIN (2.4 * size / MAX (diagram->height - above - below, 1.0), 0.2);
  double spacing_across, spacing_up, bottom;
  HlDimension across, up;
  Range x, y;
  (diagram->kind == HL_STATE_DIAGRAM_TS ? ranges_of_ts : diagram->kind == HL_STATE_DIAGRAM_HS ? ranges_of_hs : ranges_of_ph) (diagram, cycle, text_share, &x, &y);
  hl_state_diagram_dimensions (diagram->kind, &across, &up);
  diagram->frame = (HlBox) { left, above, MAX (diagram->width - left - right, 20.0), MAX (diagram->height - above - below, 20.0) };
  /* Figures stand clear of each other, and no more than a dozen of them. */
  spacing_across = MAX (5.2 * size, diagram->frame.width / 10.0);
  spacing_up = MAX (2.5 * size, diagram->frame.height / 12.0);
  bottom = diagram->frame.y + diagram->frame.height;
  hl_plot_axis_set (&diagram->x_axis, across, cycle->units, x.low, x.high, diagram->frame.x, diagram->frame.x + diagram->frame.width, spacing_across);
  (diagram->kind == HL_STATE_DIAGRAM_PH ? hl_plot_axis_set_log : hl_plot_axis_set)
    (&diagram->y_axis, up, cycle->units, y.low, y.high, bottom, diagram->frame.y, spacing_up);
  /* The picture ends with the saturation line, not somewhat below it. */
  if (diagram->kind == HL_STATE_DIAGRAM_PH && diagram->y_axis.low < diagram->dome->p[0] && y.low >= diagram->dome->p[0])
    diagram->y_axis.low = diagram->dome->p[0];
}

static HlPoint
pixel (const HlStateDiagram *diagram, HlPoint at)
{
  return (HlPoint) { hl_plot_axis_to_pixel (&diagram->x_axis, at.x), hl_plot_axis_to_pixel (&diagram->y_axis, at.y) };
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
      HlPoint at = hl_dome_nth (dome, diagram->kind, i, quality);
      double along = fabs (hl_plot_axis_to_pixel (&diagram->y_axis, at.y) - diagram->y_axis.pixel_low);
      if (fabs (along - last) < 5.0 && i % 8 != 0 && i + 1 < dome->n)
        continue;
      hl_plot_series_add (series, at.x, at.y);
      last = along;
    }
  hl_plot_layer_add (diagram->background, series);
}

void
hl_state_diagram_add_dome (HlStateDiagram *diagram)
{
  const HlDome *dome = diagram->dome;
  diagram->outline = hl_plot_series_new (HL_PLOT_OUTLINE, HL_PLOT_SOLID, 1.3);
  for (int side = 0; side <= 1; side++)
    for (guint i = 0; i < dome->n; i++)
      {
        HlPoint at = hl_dome_nth (dome, diagram->kind, side == 0 ? i : dome->n - 1 - i, side);
        hl_plot_series_add (diagram->outline, at.x, at.y);
      }
  diagram->critical = pixel (diagram, hl_dome_nth (dome, diagram->kind, dome->n - 1, 0.0));
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
  HlPoint from = pixel (diagram, hl_axes_state (diagram->kind, a)), to = pixel (diagram, hl_axes_state (diagram->kind, b));
  return hypot (to.x - from.x, to.y - from.y);
}

static void
add_point (const HlStateDiagram *diagram, HlPlotSeries *series, const HlPathPoint *point)
{
  HlPoint at = hl_axes_point (diagram->kind, point->p, point->T, point->h, point->s);
  hl_plot_series_add (series, at.x, at.y);
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
  GArray *path = hl_process_path (process, diagram->kind, &diagram->x_axis, &diagram->y_axis);
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
          add_point (diagram, series, a);
          look = here;
        }
      add_point (diagram, series, b);
    }
  g_array_unref (path);
}

static void
add_ideal_drop (HlStateDiagram *diagram, const HlProcess *process)
{
  HlPlotSeries *series;
  GArray *path;
  if (!process->has_isentropic || length_of (diagram, &process->to, &process->isentropic) < 5.0)
    return;
  series = hl_plot_series_new (HL_PLOT_QUIET, HL_PLOT_DOTTED, 1.3);
  path = hl_ideal_path (process, diagram->kind, &diagram->x_axis, &diagram->y_axis);
  for (guint i = 0; i < path->len; i++)
    add_point (diagram, series, &g_array_index (path, HlPathPoint, i));
  g_array_unref (path);
  hl_plot_layer_add (diagram->paths, series);
}

void
hl_state_diagram_add_paths (HlStateDiagram *diagram, const HlCycle *cycle)
{
  double largest = largest_flow (cycle);
  for (guint i = 0; i < cycle->sources->len; i++)
    {
      const HlPlotSeries *from = cycle->sources->pdata[i];
      HlPlotSeries *series = hl_plot_series_new (from->colour, from->dash, from->width);
      for (guint k = 0; k < hl_plot_series_n (from); k++)
        hl_plot_series_add (series, hl_plot_series_point (from, k)->x, hl_plot_series_point (from, k)->y);
      hl_plot_layer_add (diagram->paths, series);
    }
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
  return hl_state_diagram_from_cycle_on (cycle, NULL, width, height);
}

HlStateDiagram *
hl_state_diagram_from_cycle_on (const HlCycle *cycle, const HlStateDiagram *other, double width, double height)
{
  HlStateDiagram *diagram = g_new0 (HlStateDiagram, 1);
  double scale;
  diagram->kind = cycle->kind;
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
  diagram->extras = cycle->extras;
  diagram->areas = g_ptr_array_new_with_free_func ((GDestroyNotify) hl_plot_series_free);
  diagram->panel = hl_state_table_set (&diagram->table, cycle, diagram->width, diagram->height, diagram->text_size);
  hl_state_diagram_set_axes (diagram, cycle);
  if (other != NULL)
    {
      diagram->x_axis = other->x_axis;
      diagram->y_axis = other->y_axis;
      diagram->frame = other->frame;
    }
  hl_state_diagram_add_areas (diagram, cycle);
  hl_state_diagram_add_dome (diagram);
  hl_state_diagram_add_paths (diagram, cycle);
  add_marks_and_texts (diagram, cycle);
  return diagram;
}
