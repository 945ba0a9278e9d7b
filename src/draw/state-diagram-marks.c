/* Numbered states and isentropic end points of the diagram: which coincide, what they are called.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "draw/state-diagram-private.h"
#include <math.h>
#include <string.h>

/* Ids as people count: 2 before 10, names after numbers. */
static int
compare_ids (const char *a, const char *b)
{
  while (*a != '\0' && *b != '\0')
    {
      if (g_ascii_isdigit (*a) && g_ascii_isdigit (*b))
        {
          char *after_a, *after_b;
          guint64 number_a = g_ascii_strtoull (a, &after_a, 10), number_b = g_ascii_strtoull (b, &after_b, 10);
          if (number_a != number_b)
            return number_a < number_b ? -1 : 1;
          a = after_a;
          b = after_b;
          continue;
        }
      if (*a != *b)
        return (guchar) *a < (guchar) *b ? -1 : 1;
      a++;
      b++;
    }
  return (*a != '\0') - (*b != '\0');
}

static int
compare_points (gconstpointer a, gconstpointer b, gpointer data)
{
  const HlCycle *cycle = data;
  return compare_ids (g_array_index (cycle->points, HlCyclePoint, *(const guint *) a).id,
                      g_array_index (cycle->points, HlCyclePoint, *(const guint *) b).id);
}

static gboolean
is_number (const char *id, guint64 *number)
{
  return g_ascii_string_to_unsigned (id, 10, 0, G_MAXUINT32, number, NULL);
}

/* "3, 4" and "3–6, 9": three or more in a row are drawn together. */
static char *
join_ids (const HlCycle *cycle, const GArray *members)
{
  GString *text = g_string_new (NULL);
  for (guint i = 0; i < members->len;)
    {
      const char *id = g_array_index (cycle->points, HlCyclePoint, g_array_index (members, guint, i)).id;
      guint64 first, next;
      guint run = 1;
      if (is_number (id, &first))
        while (i + run < members->len
               && is_number (g_array_index (cycle->points, HlCyclePoint, g_array_index (members, guint, i + run)).id, &next)
               && next == first + run)
          run++;
      g_string_append_printf (text, "%s%s", i > 0 ? ", " : "", id);
      if (run >= 3)
        g_string_append_printf (text, "–%s", g_array_index (cycle->points, HlCyclePoint, g_array_index (members, guint, i + run - 1)).id);
      else
        run = 1;
      i += run;
    }
  return g_string_free (text, FALSE);
}

static HlPoint
place_of (const HlStateDiagram *diagram, const HlState *state)
{
  HlPoint at = hl_axes_state (diagram->kind, state);
  return (HlPoint) { hl_plot_axis_to_pixel (&diagram->x_axis, at.x), hl_plot_axis_to_pixel (&diagram->y_axis, at.y) };
}

static HlPlotColour
colour_of_state (const HlState *state)
{
  HlStreamResult result = { .has_state = TRUE, .state = *state };
  HlLook look = hl_stream_look (&result);
  return look == HL_LOOK_WATER ? HL_PLOT_WATER : look == HL_LOOK_WET ? HL_PLOT_WET : HL_PLOT_STEAM;
}

/* A dot stands where the largest of its flows is. */
static guint
heaviest (const HlCycle *cycle, const GArray *members)
{
  guint best = g_array_index (members, guint, 0);
  for (guint i = 1; i < members->len; i++)
    {
      guint n = g_array_index (members, guint, i);
      if (g_array_index (cycle->points, HlCyclePoint, n).m > g_array_index (cycle->points, HlCyclePoint, best).m)
        best = n;
    }
  return best;
}

static void
add_state (HlStateDiagram *diagram, const HlCycle *cycle, GArray *members)
{
  const HlCyclePoint *point = &g_array_index (cycle->points, HlCyclePoint, heaviest (cycle, members));
  HlMark mark = { .kind = HL_MARK_STATE, .radius = 0.33 * diagram->number_size };
  g_array_sort_with_data (members, compare_points, (gpointer) cycle);
  mark.at = place_of (diagram, &point->state);
  mark.colour = colour_of_state (&point->state);
  mark.n_streams = members->len;
  mark.streams = g_new (int, members->len);
  for (guint i = 0; i < members->len; i++)
    mark.streams[i] = g_array_index (cycle->points, HlCyclePoint, g_array_index (members, guint, i)).stream;
  mark.text = join_ids (cycle, members);
  g_array_append_val (diagram->marks, mark);
}

/* Dots that would overlap become one: the flow that is largest gathers its neighbours, then the next. */
static void
add_states (HlStateDiagram *diagram, const HlCycle *cycle, double within)
{
  guint n = cycle->points->len;
  g_autofree gboolean *is_taken = g_new0 (gboolean, n + 1);
  for (guint round = 0; round < n; round++)
    {
      g_autoptr (GArray) members = g_array_new (FALSE, FALSE, sizeof (guint));
      int best = -1;
      HlPoint centre;
      for (guint i = 0; i < n; i++)
        if (!is_taken[i] && (best < 0 || g_array_index (cycle->points, HlCyclePoint, i).m > g_array_index (cycle->points, HlCyclePoint, (guint) best).m))
          best = (int) i;
      if (best < 0)
        break;
      centre = place_of (diagram, &g_array_index (cycle->points, HlCyclePoint, (guint) best).state);
      for (guint i = 0; i < n; i++)
        {
          HlPoint at = place_of (diagram, &g_array_index (cycle->points, HlCyclePoint, i).state);
          if (is_taken[i] || (i != (guint) best && !(hypot (at.x - centre.x, at.y - centre.y) < within)))
            continue;
          is_taken[i] = TRUE;
          g_array_append_val (members, i);
        }
      add_state (diagram, cycle, members);
    }
}

static const char *
id_of_stream (const HlCycle *cycle, int stream)
{
  for (guint i = 0; i < cycle->points->len; i++)
    {
      const HlCyclePoint *point = &g_array_index (cycle->points, HlCyclePoint, i);
      if (point->stream == stream)
        return point->id;
    }
  return NULL;
}

/* An end point that a state's dot would cover, or that stands already, is left out. */
static gboolean
is_free_for_ideal (const HlStateDiagram *diagram, HlPoint at, double within)
{
  for (guint i = 0; i < diagram->marks->len; i++)
    {
      const HlMark *mark = &g_array_index (diagram->marks, HlMark, i);
      if (hypot (mark->at.x - at.x, mark->at.y - at.y) < within)
        return FALSE;
    }
  return TRUE;
}

static void
add_ideals (HlStateDiagram *diagram, const HlCycle *cycle)
{
  for (guint i = 0; i < cycle->processes->len; i++)
    {
      const HlProcess *process = &g_array_index (cycle->processes, HlProcess, i);
      HlMark mark = { .kind = HL_MARK_IDEAL, .radius = 0.22 * diagram->number_size, .colour = HL_PLOT_QUIET };
      const char *id = process->to_stream >= 0 ? id_of_stream (cycle, process->to_stream) : NULL;
      if (!process->has_isentropic)
        continue;
      mark.at = place_of (diagram, &process->isentropic);
      if (!is_free_for_ideal (diagram, mark.at, 0.65 * diagram->number_size))
        continue;
      if (id != NULL)
        mark.text = g_strconcat (id, id[0] != '\0' && g_ascii_isdigit (id[strlen (id) - 1]) ? "s" : " s", NULL);
      g_array_append_val (diagram->marks, mark);
    }
}

void
hl_state_diagram_add_marks (HlStateDiagram *diagram, const HlCycle *cycle, double within)
{
  add_states (diagram, cycle, within);
  add_ideals (diagram, cycle);
}

void
hl_state_diagram_clear_marks (HlStateDiagram *diagram)
{
  for (guint i = 0; i < diagram->marks->len; i++)
    {
      HlMark *mark = &g_array_index (diagram->marks, HlMark, i);
      g_free (mark->streams);
      g_free (mark->text);
    }
  g_array_set_size (diagram->marks, 0);
}
