/* Isobars and isotherms of the diagram: at which values, where they end, where their labels stand.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "draw/state-diagram-private.h"
#include <math.h>
#include <string.h>

#define MERGE     1.16    /* pressures closer than this ratio share one isobar */
#define MOST      16      /* isobars in one picture; of more the ratio grows until they fit */

typedef struct {
  double p, m, h;       /* pressure, largest flow at it, enthalpy there */
  double hottest;       /* highest temperature of the cycle on it; 0 none */
} Isobar;

static int
compare_pressures (gconstpointer a, gconstpointer b)
{
  double p_a = ((const Isobar *) a)->p, p_b = ((const Isobar *) b)->p;
  return (p_a > p_b) - (p_a < p_b);
}

static void
take_state (GArray *all, const HlState *state, double m)
{
  Isobar isobar = { state->p, m > 0.0 ? m : 0.0, state->h, state->T };
  /* An isobar of the liquid cannot be told from the saturation line. */
  if (state->phase != HL_PHASE_LIQUID && isfinite (state->p) && state->p > 0.0)
    g_array_append_val (all, isobar);
}

/* Close pressures merge into the one that carries most (of equals the hottest, of equals the highest). */
static void
merge_isobars (const GArray *all, double ratio, GArray *merged)
{
  g_array_set_size (merged, 0);
  for (guint i = 0; i < all->len;)
    {
      Isobar best = g_array_index (all, Isobar, i);
      double first = best.p, hottest = best.hottest;
      for (i++; i < all->len && g_array_index (all, Isobar, i).p < first * ratio; i++)
        {
          const Isobar *other = &g_array_index (all, Isobar, i);
          hottest = MAX (hottest, other->hottest);
          if (other->m > best.m * 1.001 || (other->m >= best.m * 0.999 && other->h > best.h - 1.0))
            best = *other;
        }
      best.hottest = hottest;
      g_array_append_val (merged, best);
    }
}

static GArray *
cycle_isobars (const HlCycle *cycle)
{
  g_autoptr (GArray) all = g_array_new (FALSE, FALSE, sizeof (Isobar));
  GArray *merged = g_array_new (FALSE, FALSE, sizeof (Isobar));
  for (guint i = 0; i < cycle->points->len; i++)
    take_state (all, &g_array_index (cycle->points, HlCyclePoint, i).state, g_array_index (cycle->points, HlCyclePoint, i).m);
  for (guint i = 0; i < cycle->processes->len; i++)
    {
      const HlProcess *process = &g_array_index (cycle->processes, HlProcess, i);
      take_state (all, &process->from, process->m);
      take_state (all, &process->to, process->m);
    }
  g_array_sort (all, compare_pressures);
  for (double ratio = MERGE; ratio < 100.0; ratio *= 1.15)
    {
      merge_isobars (all, ratio, merged);
      if (merged->len <= MOST)
        break;
    }
  return merged;
}

/* Without a cycle: the powers of ten of the unit shown. */
static GArray *
usual_isobars (const HlStateDiagram *diagram, const HlCycle *cycle)
{
  GArray *isobars = g_array_new (FALSE, TRUE, sizeof (Isobar));
  HlFluidLimits limits;
  hl_fluid_limits (cycle->fluid, &limits);
  for (int k = -6; k <= 6; k++)
    {
      Isobar isobar = { .p = hl_units_from_display (pow (10.0, k), HL_DIMENSION_PRESSURE, cycle->units) };
      HlSaturation saturation;
      if (isobar.p > 0.6 * limits.p_critical || hl_fluid_saturation_p (cycle->fluid, isobar.p, &saturation) != HL_OK || saturation.T < diagram->dome->T[0] || (diagram->kind == HL_STATE_DIAGRAM_TS && saturation.T < diagram->y_axis.low))
        continue;
      g_array_append_val (isobars, isobar);
    }
  return isobars;
}

/* Three significant figures, no exponent, no needless zeros: 65 bar, 2.5 bar, 0.07 bar, 2440 psia. */
static char *
pressure_text (double p, HlUnitSet units)
{
  double shown = hl_units_to_display (p, HL_DIMENSION_PRESSURE, units);
  int decimals = (int) CLAMP (2.0 - floor (log10 (shown) + 1e-9), 0.0, 6.0);
  char number[32];
  g_snprintf (number, sizeof number, "%.*f", decimals, shown);
  if (decimals > 0)
    {
      char *end = number + strlen (number);
      while (end[-1] == '0')
        *--end = '\0';
      if (end[-1] == '.')
        *--end = '\0';
    }
  return g_strdup_printf ("%s %s", number, hl_units_label (HL_DIMENSION_PRESSURE, units));
}

typedef struct {
  HlTextKind    kind;
  char         *text;
  HlPlotSeries *series;
  GArray       *pixels;      /* of HlPoint, cut at the frame */
  double        keep;        /* length from the start that a label must leave [pixels] */
  double        length;
} Line;

static HlPoint
pixel (const HlStateDiagram *diagram, HlPoint at)
{
  return (HlPoint) { hl_plot_axis_to_pixel (&diagram->x_axis, at.x), hl_plot_axis_to_pixel (&diagram->y_axis, at.y) };
}

static void
line_clear (gpointer data)
{
  Line *line = data;
  g_array_unref (line->pixels);
  g_free (line->text);
}

static Line
line_new (HlTextKind kind, char *text, HlPlotDash dash)
{
  return (Line) { kind, text, hl_plot_series_new (HL_PLOT_QUIET, dash, 0.7), g_array_new (FALSE, FALSE, sizeof (HlPoint)), 0.0, 0.0 };
}

/* Takes a point of the path, in pixels up to the right end of the frame.  FALSE beyond it. */
static gboolean
line_take (Line *line, const HlStateDiagram *diagram, const HlPathPoint *point)
{
  HlPoint value = hl_axes_point (diagram->kind, point->p, point->T, point->h, point->s), at = pixel (diagram, value), last = at;
  double right = diagram->frame.x + diagram->frame.width;
  if (line->pixels->len > 0)
    last = g_array_index (line->pixels, HlPoint, line->pixels->len - 1);
  hl_plot_series_add (line->series, value.x, value.y);
  if (last.x >= right)
    return FALSE;
  if (at.x > right)
    at = (HlPoint) { right, last.y + (at.y - last.y) * (right - last.x) / (at.x - last.x) };
  g_array_append_val (line->pixels, at);
  line->length += hypot (at.x - last.x, at.y - last.y);
  return TRUE;
}

static double
hottest_of_isobar (const HlStateDiagram *diagram, const HlFluid *fluid, double p)
{
  HlFluidLimits limits;
  HlState top;
  hl_fluid_limits (fluid, &limits);
  if (diagram->kind == HL_STATE_DIAGRAM_TS)
    return MIN (diagram->y_axis.high, limits.T_max);
  return hl_fluid_state_ph (fluid, p, diagram->y_axis.high, &top) == HL_OK ? MIN (top.T, limits.T_max) : limits.T_max;
}

static Line
make_isobar (HlStateDiagram *diagram, const HlCycle *cycle, const Isobar *isobar)
{
  Line line = line_new (HL_TEXT_PRESSURE, pressure_text (isobar->p, cycle->units), HL_PLOT_SOLID);
  double T_low = diagram->kind == HL_STATE_DIAGRAM_TS ? MAX (diagram->y_axis.low, diagram->dome->T[0]) : diagram->dome->T[0];
  GArray *path = hl_isobar_path (cycle->fluid, isobar->p, T_low, hottest_of_isobar (diagram, cycle->fluid, isobar->p),
                                 diagram->kind, &diagram->x_axis, &diagram->y_axis);
  for (guint i = 0; i < path->len; i++)
    {
      const HlPathPoint *point = &g_array_index (path, HlPathPoint, i);
      if (!line_take (&line, diagram, point))
        continue;
      /* The dome's part and a little more stays, and what the cycle runs along. */
      if (i <= 1)
        line.keep = line.length + 2.2 * diagram->text_size;
      if (isobar->hottest > 0.0 && point->T <= isobar->hottest + 1e-6)
        line.keep = MAX (line.keep, line.length + 0.9 * diagram->text_size);
    }
  g_array_unref (path);
  return line;
}

/* --- isotherms: beside the isobars of h-s where steam is superheated, in place of them in p-h --- */

#define MOST_ISOTHERMS 8

/* The pressure at which an isotherm of h-s leaves the frame on the right. */
static double
pressure_at_right (const HlStateDiagram *diagram, const HlFluid *fluid, double T, double p_high)
{
  double low = log (p_high) - 16.0, high = log (p_high);
  for (int i = 0; i < 40; i++)
    {
      double middle = (low + high) / 2.0;
      HlState state;
      if (hl_fluid_state_pT (fluid, exp (middle), T, &state) == HL_OK && state.s > diagram->x_axis.high)
        low = middle;
      else
        high = middle;
    }
  return exp (low);
}

static Line
make_isotherm (HlStateDiagram *diagram, const HlCycle *cycle, double T, char *text)
{
  Line line = line_new (HL_TEXT_ISOTHERM, text, HL_PLOT_DASHED);
  HlFluidLimits limits;
  HlSaturation saturation;
  double p_high, p_low;
  guint n_kept;
  GArray *path;
  hl_fluid_limits (cycle->fluid, &limits);
  if (diagram->kind == HL_STATE_DIAGRAM_PH)
    {
      p_high = MIN (diagram->y_axis.high, limits.p_max);
      p_low = diagram->y_axis.low;
    }
  else
    {
      gboolean has_vapour = T < limits.T_critical && hl_fluid_saturation_T (cycle->fluid, T, &saturation) == HL_OK;
      p_high = has_vapour ? NAN : 2.0 * limits.p_critical;
      p_low = pressure_at_right (diagram, cycle->fluid, T, has_vapour ? saturation.p : p_high);
    }
  path = hl_isotherm_path (cycle->fluid, T, p_high, p_low, diagram->kind, &diagram->x_axis, &diagram->y_axis, &n_kept);
  for (guint i = 0; i < path->len; i++)
    if (line_take (&line, diagram, &g_array_index (path, HlPathPoint, i)) && i < n_kept)
      line.keep = line.length + diagram->text_size;
  g_array_unref (path);
  return line;
}

/* The hottest temperature that the diagram shows where the vapour is thin. */
static double
hottest_shown (const HlStateDiagram *diagram, const HlFluid *fluid)
{
  HlFluidLimits limits;
  HlState thin;
  double h = diagram->kind == HL_STATE_DIAGRAM_PH ? diagram->x_axis.high : diagram->y_axis.high;
  hl_fluid_limits (fluid, &limits);
  return hl_fluid_state_ph (fluid, 0.005 * limits.p_critical, h, &thin) == HL_OK ? MIN (thin.T, limits.T_max) : limits.T_max;
}

static void
add_isotherms (HlStateDiagram *diagram, const HlCycle *cycle, GArray *lines)
{
  double low = hl_units_to_display (diagram->dome->T[0], HL_DIMENSION_TEMPERATURE, cycle->units);
  double high = hl_units_to_display (hottest_shown (diagram, cycle->fluid), HL_DIMENSION_TEMPERATURE, cycle->units), step = 50.0;
  /* The cold ones of h-s run along each other at the foot of the vapour line. */
  if (diagram->kind == HL_STATE_DIAGRAM_HS)
    low += 0.15 * (high - low);
  while ((high - low) / step > MOST_ISOTHERMS)
    step *= 2.0;
  /* Adding nothing makes of a negative zero a plain one. */
  for (double shown = step * ceil (low / step) + 0.0; shown <= high; shown += step)
    {
      double T = hl_units_from_display (shown, HL_DIMENSION_TEMPERATURE, cycle->units);
      Line line = make_isotherm (diagram, cycle, T, g_strdup_printf ("%.0f %s", shown, hl_units_label (HL_DIMENSION_TEMPERATURE, cycle->units)));
      g_array_append_val (lines, line);
    }
}

/* Place and direction @from_end pixels before the end. */
static gboolean
point_before_end (const Line *line, double from_end, HlPoint *at, HlPoint *direction)
{
  for (guint i = line->pixels->len - 1; i > 0; i--)
    {
      HlPoint a = g_array_index (line->pixels, HlPoint, i - 1), b = g_array_index (line->pixels, HlPoint, i);
      double length = hypot (b.x - a.x, b.y - a.y);
      if (length > 1e-9 && from_end <= length)
        {
          *direction = (HlPoint) { (b.x - a.x) / length, (b.y - a.y) / length };
          *at = (HlPoint) { b.x - direction->x * from_end, b.y - direction->y * from_end };
          return TRUE;
        }
      from_end -= length;
    }
  return FALSE;
}

/* The box that the line runs into, or one beside the line. */
static HlBox
box_for (HlPoint at, HlPoint direction, int side, double width, double height)
{
  double reach_x = (width / 2.0 + 3.0) / MAX (fabs (direction.x), 1e-6), reach_y = (height / 2.0 + 1.5) / MAX (fabs (direction.y), 1e-6);
  double reach = MIN (reach_x, reach_y);
  HlPoint centre = { at.x + direction.x * reach, at.y + direction.y * reach };
  if (side != 0)
    centre = (HlPoint) { at.x + side * (width / 2.0 + 5.0), at.y };
  return (HlBox) { centre.x - width / 2.0, centre.y - height / 2.0, width, height };
}

static gboolean
place_label (HlStateDiagram *diagram, HlPlotLabels *labels, const Line *line, double *end)
{
  const char *text = line->text;
  double width, height, best = G_MAXDOUBLE;
  HlBox best_box = { 0.0, 0.0, 0.0, 0.0 };
  HlPlotLabelPlace place;
  hl_state_diagram_text_size (text, 0.93 * diagram->text_size, FALSE, &width, &height);
  *end = line->length;
  for (double from_end = 0.0; line->length - from_end >= line->keep; from_end += 5.0)
    {
      HlPoint at, direction;
      if (0.06 * from_end >= best || !point_before_end (line, from_end, &at, &direction))
        break;
      for (int side = -1; side <= 1; side++)
        {
          HlBox box = box_for (at, direction, side, width, height);
          double cost = 0.06 * from_end + (side == 0 ? 0.0 : side > 0 ? 5.0 : 6.0);
          if (cost >= best || !hl_plot_labels_is_free (labels, &box))
            continue;
          cost += 0.5 * hl_plot_labels_cost (labels, &box);
          if (cost >= best)
            continue;
          best = cost;
          best_box = box;
          *end = side == 0 ? line->length - from_end : line->length;
        }
    }
  if (best == G_MAXDOUBLE)
    return FALSE;
  hl_plot_labels_take (labels, &best_box, &place);
  {
    HlDiagramText item = { line->kind, g_strdup (text), best_box };
    g_array_append_val (diagram->texts, item);
  }
  return TRUE;
}

/* Shortens the series to @end pixels. */
static void
cut_series (const HlStateDiagram *diagram, HlPlotSeries *series, double end)
{
  double length = 0.0;
  for (guint i = 1; i < hl_plot_series_n (series); i++)
    {
      HlPoint *a = &g_array_index (series->points, HlPoint, i - 1), *b = &g_array_index (series->points, HlPoint, i);
      HlPoint pixel_a = pixel (diagram, *a), pixel_b = pixel (diagram, *b);
      double step = hypot (pixel_b.x - pixel_a.x, pixel_b.y - pixel_a.y);
      if (length + step > end && step > 1e-9)
        {
          double t = (end - length) / step;
          *b = (HlPoint) { a->x + t * (b->x - a->x), a->y + t * (b->y - a->y) };
          g_array_set_size (series->points, i + 1);
          return;
        }
      length += step;
    }
}

/* Round pressures beside the cycle's own, where they do not crowd each other. */
static void
add_round_isobars (const HlStateDiagram *diagram, const HlCycle *cycle, GArray *isobars)
{
  g_autoptr (GArray) round = usual_isobars (diagram, cycle);
  guint n = isobars->len;
  for (guint i = 0; i < round->len; i++)
    {
      Isobar isobar = g_array_index (round, Isobar, i);
      gboolean is_free = TRUE;
      for (guint k = 0; k < n; k++)
        is_free = is_free && fabs (log (g_array_index (isobars, Isobar, k).p / isobar.p)) > 0.5;
      if (is_free)
        g_array_append_val (isobars, isobar);
    }
}

static void
add_isobars (HlStateDiagram *diagram, const HlCycle *cycle, GArray *lines)
{
  GArray *isobars = cycle_isobars (cycle);
  if (isobars->len == 0)
    {
      g_array_unref (isobars);
      isobars = usual_isobars (diagram, cycle);
    }
  else if (cycle->extras & HL_DIAGRAM_ISOBARS)
    add_round_isobars (diagram, cycle, isobars);
  for (guint i = 0; i < isobars->len; i++)
    {
      Line line = make_isobar (diagram, cycle, &g_array_index (isobars, Isobar, i));
      g_array_append_val (lines, line);
    }
  g_array_unref (isobars);
}

/* Adds the lines of equal pressure or temperature, and their ink to @labels; element-type Line, for the next function. */
GArray *
hl_state_diagram_add_isolines (HlStateDiagram *diagram, const HlCycle *cycle, HlPlotLabels *labels)
{
  GArray *lines = g_array_new (FALSE, FALSE, sizeof (Line));
  g_array_set_clear_func (lines, line_clear);
  if (diagram->kind != HL_STATE_DIAGRAM_PH)
    add_isobars (diagram, cycle, lines);
  if (diagram->kind != HL_STATE_DIAGRAM_TS)
    add_isotherms (diagram, cycle, lines);
  for (guint i = 0; i < lines->len; i++)
    {
      const Line *line = &g_array_index (lines, Line, i);
      hl_plot_layer_add (diagram->background, line->series);
      for (guint k = 1; k < line->pixels->len; k++)
        hl_plot_labels_add_line (labels, g_array_index (line->pixels, HlPoint, k - 1), g_array_index (line->pixels, HlPoint, k), 0.25);
    }
  return lines;
}

static void
label_line (HlStateDiagram *diagram, const Line *line, HlPlotLabels *labels)
{
  double end;
  if (line->pixels->len >= 2 && place_label (diagram, labels, line, &end))
    cut_series (diagram, line->series, end);
}

/* The lowest and the highest pressure are named first, then from high to low, then temperatures; what finds no room stays without a name. */
void
hl_state_diagram_label_isolines (HlStateDiagram *diagram, const GArray *lines, HlPlotLabels *labels)
{
  guint n_isobars = 0;
  for (guint i = 0; i < lines->len; i++)
    n_isobars += g_array_index (lines, Line, i).kind == HL_TEXT_PRESSURE;
  for (guint i = 0; i < n_isobars; i++)
    label_line (diagram, &g_array_index (lines, Line, i == 0 ? 0 : n_isobars - i), labels);
  for (guint i = n_isobars; i < lines->len; i++)
    label_line (diagram, &g_array_index (lines, Line, i), labels);
}
