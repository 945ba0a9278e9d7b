/* Places the texts of the diagram: states first, then pressures, isentropic end points, qualities.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "draw/state-diagram-private.h"
#include "draw/text.h"
#include <math.h>

#define FAR_REACH  130.0     /* pixels that a state's number may stand away from its dot */
#define NEAR_REACH 50.0      /* the same in a crowd, where a long leader would find no way */
#define CROWD      80        /* dots that make a crowd: one round must do */

void
hl_state_diagram_text_size (const char *text, double size, gboolean is_bold, double *width, double *height)
{
  /* Window and paper have different families; the picture is laid out once for all. */
  double light = hl_text_width (hl_theme (HL_THEME_LIGHT), text, size, is_bold), paper = hl_text_width (hl_theme (HL_THEME_PAPER), text, size, is_bold);
  *width = MAX (light, paper);
  *height = HL_TEXT_HEIGHT * size;
}

static void
add_ink (const HlStateDiagram *diagram, HlPlotLabels *labels, const HlPlotSeries *series, double weight)
{
  for (guint i = 1; i < hl_plot_series_n (series); i++)
    {
      const HlPoint *a = hl_plot_series_point (series, i - 1), *b = hl_plot_series_point (series, i);
      HlPoint from = { hl_plot_axis_to_pixel (&diagram->x_axis, a->x), hl_plot_axis_to_pixel (&diagram->y_axis, a->y) };
      HlPoint to = { hl_plot_axis_to_pixel (&diagram->x_axis, b->x), hl_plot_axis_to_pixel (&diagram->y_axis, b->y) };
      hl_plot_labels_add_line (labels, from, to, weight);
    }
}

static HlBox
box_of_mark (const HlMark *mark)
{
  double reach = mark->radius + 1.0;
  return (HlBox) { mark->at.x - reach, mark->at.y - reach, 2.0 * reach, 2.0 * reach };
}

static HlPlotLabelWish
wish_of (const HlStateDiagram *diagram, const HlMark *mark)
{
  HlPlotLabelWish wish = { .anchor = mark->at, /* Room for the ring of the selection. */
                           .clearance = mark->radius + (mark->kind == HL_MARK_STATE ? 4.0 : 2.0) };
  gboolean is_state = mark->kind == HL_MARK_STATE;
  hl_state_diagram_text_size (mark->text, is_state ? diagram->number_size : 0.95 * diagram->text_size, is_state, &wish.width, &wish.height);
  wish.reach = !is_state ? 22.0 : diagram->marks->len > CROWD ? NEAR_REACH : FAR_REACH;
  /* A number stands clear of the saturation line: outside of it, as far as the neighbours let it. */
  if (mark->colour == HL_PLOT_WATER)
    wish.towards = (HlPoint) { -0.6, -0.8 };
  if (!is_state)
    wish.towards = (HlPoint) { -0.8, 0.6 };
  return wish;
}

/* How many other dots are near: crowded ones choose first. */
static guint
neighbours (const HlStateDiagram *diagram, guint n)
{
  const HlMark *mark = &g_array_index (diagram->marks, HlMark, n);
  guint count = 0;
  for (guint i = 0; i < diagram->marks->len; i++)
    {
      const HlMark *other = &g_array_index (diagram->marks, HlMark, i);
      count += hypot (other->at.x - mark->at.x, other->at.y - mark->at.y) < 3.5 * diagram->number_size;
    }
  return count;
}

typedef struct { guint mark, neighbours, failures; } Turn;

static int
compare_turns (gconstpointer a, gconstpointer b)
{
  const Turn *turn_a = a, *turn_b = b;
  if (turn_a->failures != turn_b->failures)
    return turn_a->failures > turn_b->failures ? -1 : 1;
  if (turn_a->neighbours != turn_b->neighbours)
    return turn_a->neighbours > turn_b->neighbours ? -1 : 1;
  return turn_a->mark < turn_b->mark ? -1 : turn_a->mark > turn_b->mark;
}

static gboolean
place_one (HlStateDiagram *diagram, HlPlotLabels *labels, guint n)
{
  HlMark *mark = &g_array_index (diagram->marks, HlMark, n);
  HlPlotLabelWish wish = wish_of (diagram, mark);
  hl_plot_labels_remove (labels, &mark->label);
  return hl_plot_labels_place (labels, &wish, (int) n, &mark->label);
}

/* Places all in turn; those that found no room get a failure more.  TRUE where all did. */
static gboolean
place_all (HlStateDiagram *diagram, HlPlotLabels *labels, GArray *turns)
{
  gboolean is_complete = TRUE;
  for (guint i = 0; i < turns->len; i++)
    {
      Turn *turn = &g_array_index (turns, Turn, i);
      if (place_one (diagram, labels, turn->mark))
        continue;
      turn->failures++;
      is_complete = FALSE;
    }
  return is_complete;
}

static void
place_marks (HlStateDiagram *diagram, HlPlotLabels *labels, HlMarkKind kind)
{
  g_autoptr (GArray) turns = g_array_new (FALSE, FALSE, sizeof (Turn));
  int n_rounds = kind == HL_MARK_STATE ? 5 : 1;
  for (guint i = 0; i < diagram->marks->len; i++)
    {
      const HlMark *mark = &g_array_index (diagram->marks, HlMark, i);
      Turn turn = { i, neighbours (diagram, i), 0 };
      if (mark->kind == kind && mark->text != NULL)
        g_array_append_val (turns, turn);
    }
  g_array_sort (turns, compare_turns);
  /* Where some find no room, all start anew with those first. */
  for (int round = 0; !place_all (diagram, labels, turns) && round + 1 < n_rounds && turns->len <= CROWD; round++)
    {
      for (guint i = 0; i < turns->len; i++)
        {
          HlMark *mark = &g_array_index (diagram->marks, HlMark, g_array_index (turns, Turn, i).mark);
          hl_plot_labels_remove (labels, &mark->label);
          mark->label.is_placed = FALSE;
        }
      g_array_sort (turns, compare_turns);
    }
  /* Once more, so that early ones may move now that the later ones are known. */
  for (guint i = 0; i < turns->len && turns->len <= CROWD; i++)
    place_one (diagram, labels, g_array_index (turns, Turn, i).mark);
}

/* The coldest point of the dome inside the axes. */
static double
lowest_shown (const HlStateDiagram *diagram)
{
  const HlDome *dome = diagram->dome;
  guint n = 0;
  while (n + 1 < dome->n && hl_dome_nth (dome, diagram->kind, n, 0.5).y < diagram->y_axis.low)
    n++;
  return diagram->kind == HL_STATE_DIAGRAM_TS ? MAX (dome->T[0], diagram->y_axis.low) : dome->T[n];
}

#define N_NAMED 4

static const double named_qualities[N_NAMED] = { 0.2, 0.4, 0.6, 0.8 };

static char *
quality_text (guint n)
{
  return g_strdup_printf (n == 0 ? "x = %.1f" : "%.1f", named_qualities[n]);
}

static HlBox
quality_box (const HlStateDiagram *diagram, guint n, double T)
{
  g_autofree char *text = quality_text (n);
  HlPoint at = hl_dome_point (diagram->dome, diagram->kind, T, named_qualities[n]);
  double width, height;
  hl_state_diagram_text_size (text, 0.9 * diagram->text_size, FALSE, &width, &height);
  return (HlBox) { hl_plot_axis_to_pixel (&diagram->x_axis, at.x) - width / 2.0,
                   hl_plot_axis_to_pixel (&diagram->y_axis, at.y) - height / 2.0, width, height };
}

/* Names the qualities @first to @last, centred on their lines, all at the temperature that suits best. */
static void
place_row (HlStateDiagram *diagram, HlPlotLabels *labels, guint first, guint last)
{
  const HlDome *dome = diagram->dome;
  double T_top = dome->T[dome->n - 1], T_low = lowest_shown (diagram), best = G_MAXDOUBLE;
  HlBox best_boxes[N_NAMED];
  for (double level = 0.06; level < 0.7; level += 0.01)
    {
      double T = T_low + level * (T_top - T_low), cost = 3.0 * level;
      HlBox boxes[N_NAMED];
      gboolean is_free = TRUE;
      for (guint i = first; i <= last && is_free; i++)
        {
          boxes[i] = quality_box (diagram, i, T);
          is_free = hl_plot_labels_is_free (labels, &boxes[i]);
          cost += is_free ? hl_plot_labels_cost (labels, &boxes[i]) : 0.0;
        }
      /* In h-s the lines of low quality run so close that a name would belong to none of them. */
      if (!is_free || cost >= best || (last == first && cost > 12.0) || (last > first && boxes[last].x - boxes[first].x <= 5.0 * boxes[first].width))
        continue;
      best = cost;
      for (guint i = first; i <= last; i++)
        best_boxes[i] = boxes[i];
    }
  for (guint i = first; best < G_MAXDOUBLE && i <= last; i++)
    {
      HlDiagramText text = { HL_TEXT_QUALITY, quality_text (i), best_boxes[i] };
      HlPlotLabelPlace place;
      hl_plot_labels_take (labels, &best_boxes[i], &place);
      g_array_append_val (diagram->texts, text);
    }
}

/* "x = 0.2", "0.4" ... in a row where one temperature is a level line; in h-s each finds its own place. */
static void
place_qualities (HlStateDiagram *diagram, HlPlotLabels *labels)
{
  if (diagram->kind != HL_STATE_DIAGRAM_HS)
    place_row (diagram, labels, 0, N_NAMED - 1);
  else
    for (guint i = 0; i < N_NAMED; i++)
      place_row (diagram, labels, i, i);
}

static void
add_gap (HlStateDiagram *diagram, const HlBox *box)
{
  HlBox gap = { box->x - 0.7, box->y - 0.7, box->width + 1.4, box->height + 1.4 };
  g_array_append_val (diagram->gaps, gap);
}

gboolean
hl_state_diagram_add_texts (HlStateDiagram *diagram, const HlCycle *cycle)
{
  HlBox inside = { diagram->frame.x + 2.0, diagram->frame.y + 1.0, diagram->frame.width - 3.0, diagram->frame.height - 3.0 };
  g_autoptr (HlPlotLabels) labels = hl_plot_labels_new (&inside);
  g_autoptr (GArray) lines = NULL;
  gboolean is_complete = TRUE;
  for (guint i = 0; i < hl_plot_layer_n (diagram->paths); i++)
    add_ink (diagram, labels, hl_plot_layer_series (diagram->paths, i), 1.0);
  add_ink (diagram, labels, diagram->outline, 0.7);
  lines = hl_state_diagram_add_isolines (diagram, cycle, labels);
  hl_plot_labels_add_block (labels, &(HlBox) { diagram->critical.x - 3.5, diagram->critical.y - 3.5, 7.0, 7.0 }, -1);
  for (guint i = 0; i < diagram->marks->len; i++)
    {
      HlBox box = box_of_mark (&g_array_index (diagram->marks, HlMark, i));
      hl_plot_labels_add_block (labels, &box, (int) i);
    }
  place_marks (diagram, labels, HL_MARK_STATE);
  hl_state_diagram_label_isolines (diagram, lines, labels);
  place_marks (diagram, labels, HL_MARK_IDEAL);
  place_qualities (diagram, labels);
  for (guint i = 0; i < diagram->marks->len; i++)
    {
      const HlMark *mark = &g_array_index (diagram->marks, HlMark, i);
      if (mark->label.is_placed)
        add_gap (diagram, &mark->label.box);
      else if (mark->kind == HL_MARK_STATE)
        is_complete = FALSE;
    }
  for (guint i = 0; i < diagram->texts->len; i++)
    add_gap (diagram, &g_array_index (diagram->texts, HlDiagramText, i).box);
  return is_complete;
}
