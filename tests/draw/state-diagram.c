/* The finished temperature-entropy diagram: texts apart, nothing clipped, the pointer finds the states.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "cycle-fixtures.h"
#include "diagram-checks.h"
#include <math.h>
#include <string.h>

static guint
n_texts_of (const HlStateDiagram *diagram, HlTextKind kind)
{
  guint n = 0;
  for (guint i = 0; i < diagram->texts->len; i++)
    n += g_array_index (diagram->texts, HlDiagramText, i).kind == kind;
  return n;
}

static gboolean
has_text (const HlStateDiagram *diagram, const char *text)
{
  for (guint i = 0; i < diagram->texts->len; i++)
    if (strcmp (g_array_index (diagram->texts, HlDiagramText, i).text, text) == 0)
      return TRUE;
  for (guint i = 0; i < diagram->marks->len; i++)
    if (mark_at (diagram, i)->text != NULL && mark_at (diagram, i)->label.is_placed && strcmp (mark_at (diagram, i)->text, text) == 0)
      return TRUE;
  return FALSE;
}

static void
check_cycle (HlCycle *cycle, guint may_miss)
{
  for (guint i = 0; i < G_N_ELEMENTS (diagram_sizes); i++)
    {
      g_autoptr (HlStateDiagram) diagram = hl_state_diagram_from_cycle (cycle, diagram_sizes[i].width, diagram_sizes[i].height);
      check_diagram (diagram);
      g_assert_cmpuint (n_without_number (diagram), <=, may_miss);
    }
  hl_cycle_free (cycle);
}

static void
test_texts_of_whole_plants (void)
{
  for (int units = 0; units < HL_N_UNIT_SETS; units++)
    {
      check_cycle (cycle_simple ((HlUnitSet) units), 0);
      check_cycle (cycle_industry ((HlUnitSet) units), 0);
      check_cycle (cycle_reheat ((HlUnitSet) units, 168e5, 811.15), 0);
      check_cycle (cycle_reheat ((HlUnitSet) units, 260e5, 873.15), 0);
      check_cycle (hl_cycle_new (NULL, (HlUnitSet) units), 0);
    }
}

static void
test_texts_of_random_states (void)
{
  for (guint32 seed = 1; seed <= 30; seed++)
    check_cycle (cycle_random (seed, 4 + seed % 27), 0);
}

/* Where hundreds of states crowd a small picture some numbers give way; none overlaps. */
static void
test_a_crowd_gives_way (void)
{
  check_cycle (cycle_random (7, 250), 200);
}

static void
test_an_empty_plant_shows_dome_and_pressures (void)
{
  g_autoptr (HlCycle) cycle = hl_cycle_new (NULL, HL_UNITS_METRIC);
  g_autoptr (HlStateDiagram) diagram = hl_state_diagram_from_cycle (cycle, 960.0, 600.0);
  g_assert_cmpuint (diagram->marks->len, ==, 0);
  g_assert_cmpuint (hl_plot_layer_n (diagram->paths), ==, 0);
  g_assert_cmpuint (n_texts_of (diagram, HL_TEXT_QUALITY), ==, 4);
  g_assert_true (has_text (diagram, "0.1 bar"));
  g_assert_true (has_text (diagram, "1 bar"));
  g_assert_true (has_text (diagram, "10 bar"));
  g_assert_true (has_text (diagram, "100 bar"));
  /* The top of the dome lies inside, with air above. */
  g_assert_cmpfloat (diagram->y_axis.high, >, 647.096 + 10.0);
}

/* The other two diagrams stand the same checks; every state lies where its values say. */
static void
check_kind (HlCycle *cycle, HlStateDiagramKind kind, guint may_miss)
{
  cycle->kind = kind;
  for (guint i = 0; i < cycle->points->len; i++)
    {
      g_autoptr (HlStateDiagram) diagram = hl_state_diagram_from_cycle (cycle, 960.0, 600.0);
      const HlState *state = &cycle_point (cycle, i)->state;
      double x, y, across = 0.0, up = 0.0;
      hl_state_diagram_to_pixel (diagram, kind == HL_STATE_DIAGRAM_HS ? state->s : state->h, kind == HL_STATE_DIAGRAM_HS ? state->h : state->p, &x, &y);
      g_assert_true (hl_state_diagram_to_state (diagram, x, y, &across, &up));
      g_assert_cmpfloat_with_epsilon (across, kind == HL_STATE_DIAGRAM_HS ? state->s : state->h, 1e-3);
      g_assert_cmpfloat_with_epsilon (up, kind == HL_STATE_DIAGRAM_HS ? state->h : state->p, 1e-3);
      g_assert_cmpint (hl_state_diagram_stream_at (diagram, x, y, 8.0), >=, 0);
    }
  check_cycle (cycle, may_miss);
}

static void
test_other_kinds (void)
{
  for (int kind = HL_STATE_DIAGRAM_HS; kind < HL_N_STATE_DIAGRAMS; kind++)
    {
      for (int units = 0; units < HL_N_UNIT_SETS; units++)
        {
          check_kind (cycle_simple ((HlUnitSet) units), (HlStateDiagramKind) kind, 0);
          check_kind (cycle_industry ((HlUnitSet) units), (HlStateDiagramKind) kind, 0);
          check_kind (cycle_reheat ((HlUnitSet) units, 168e5, 811.15), (HlStateDiagramKind) kind, 0);
          check_kind (cycle_reheat ((HlUnitSet) units, 260e5, 873.15), (HlStateDiagramKind) kind, 0);
          check_kind (hl_cycle_new (NULL, (HlUnitSet) units), (HlStateDiagramKind) kind, 0);
        }
      for (guint32 seed = 1; seed <= 12; seed++)
        check_kind (cycle_random (seed, 4 + seed % 17), (HlStateDiagramKind) kind, 0);
    }
}

/* p-h: isotherms instead of isobars; h-s: both.  Points of an isotherm have its temperature. */
static void
test_lines_of_other_kinds (void)
{
  g_autoptr (HlCycle) cycle = cycle_simple (HL_UNITS_METRIC);
  cycle->kind = HL_STATE_DIAGRAM_PH;
  {
    g_autoptr (HlStateDiagram) diagram = hl_state_diagram_from_cycle (cycle, 960.0, 600.0);
    guint n_kept;
    GArray *path = hl_isotherm_path (hl_fluid_water (), 500.0, 100e5, 1e4, HL_STATE_DIAGRAM_PH, &diagram->x_axis, &diagram->y_axis, &n_kept);
    g_assert_true (diagram->y_axis.is_log);
    g_assert_true (has_text (diagram, "200 °C"));
    g_assert_cmpuint (n_texts_of (diagram, HL_TEXT_PRESSURE), ==, 0);
    g_assert_true (has_text (diagram, "2s"));
    g_assert_cmpuint (n_kept, >=, 4);
    g_assert_cmpuint (path->len, >, n_kept + 2);
    for (guint i = 0; i < path->len; i++)
      {
        const HlPathPoint *point = &g_array_index (path, HlPathPoint, i);
        g_assert_cmpfloat_with_epsilon (point->T, 500.0, 1e-9);
        if (i > 0)
          g_assert_cmpfloat (point->h, >, g_array_index (path, HlPathPoint, i - 1).h - 4000.0);
      }
    /* IAPWS R7-97(2012), table 35: saturation pressure at 500 K. */
    g_assert_cmpfloat_with_epsilon (g_array_index (path, HlPathPoint, n_kept - 1).p, 0.263889776e7, 0.01);
    g_array_unref (path);
  }
  cycle->kind = HL_STATE_DIAGRAM_HS;
  {
    g_autoptr (HlStateDiagram) diagram = hl_state_diagram_from_cycle (cycle, 960.0, 600.0);
    g_assert_true (has_text (diagram, "80 bar"));
    g_assert_true (has_text (diagram, "0.08 bar"));
    g_assert_true (has_text (diagram, "400 °C"));
    /* The critical point of water: 4412 J/(kg K), 2087.5 kJ/kg (IAPWS-IF97 at 647.096 K, 322 kg/m3). */
    {
      double x, y;
      hl_state_diagram_to_pixel (diagram, 4412.0, 2087.5e3, &x, &y);
      g_assert_cmpfloat (hypot (diagram->critical.x - x, diagram->critical.y - y), <, 1.0);
    }
  }
}

/* The ideal drop keeps its entropy, also where it is no straight line. */
static void
test_ideal_drop_of_ph (void)
{
  g_autoptr (HlCycle) cycle = cycle_simple (HL_UNITS_METRIC);
  cycle->kind = HL_STATE_DIAGRAM_PH;
  g_autoptr (HlStateDiagram) diagram = hl_state_diagram_from_cycle (cycle, 960.0, 600.0);
  for (guint i = 0; i < cycle->processes->len; i++)
    {
      const HlProcess *process = &g_array_index (cycle->processes, HlProcess, i);
      if (process->kind != HL_PROCESS_EXPANSION)
        continue;
      GArray *path = hl_ideal_path (process, HL_STATE_DIAGRAM_PH, &diagram->x_axis, &diagram->y_axis);
      g_assert_cmpuint (path->len, >, 5);
      for (guint k = 0; k < path->len; k++)
        g_assert_cmpfloat_with_epsilon (g_array_index (path, HlPathPoint, k).s, process->from.s, 1e-2);
      g_array_unref (path);
    }
}

static void
test_words_of_the_kinds (void)
{
  HlStateDiagramKind kind = HL_STATE_DIAGRAM_TS;
  g_assert_true (hl_state_diagram_kind_from_id ("ph", &kind));
  g_assert_cmpint (kind, ==, HL_STATE_DIAGRAM_PH);
  g_assert_false (hl_state_diagram_kind_from_id ("pv", &kind));
  g_assert_cmpint (kind, ==, HL_STATE_DIAGRAM_PH);
  g_assert_cmpstr (hl_state_diagram_sign (HL_STATE_DIAGRAM_HS), ==, "h-s");
}

static void
test_numbers_pressures_and_ideal_points (void)
{
  g_autoptr (HlCycle) cycle = cycle_simple (HL_UNITS_METRIC);
  g_autoptr (HlStateDiagram) diagram = hl_state_diagram_from_cycle (cycle, 960.0, 600.0);
  g_assert_true (has_text (diagram, "1"));
  g_assert_true (has_text (diagram, "2"));
  g_assert_true (has_text (diagram, "2s"));
  /* Condensate before and after the pump lie 0.3 K apart. */
  g_assert_true (has_text (diagram, "3, 4"));
  g_assert_true (has_text (diagram, "80 bar"));
  g_assert_true (has_text (diagram, "0.08 bar"));
  g_assert_cmpuint (n_texts_of (diagram, HL_TEXT_PRESSURE), ==, 2);
}

static void
test_runs_of_coinciding_states_are_drawn_together (void)
{
  g_autoptr (HlCycle) cycle = hl_cycle_new (NULL, HL_UNITS_METRIC);
  g_autoptr (HlStateDiagram) diagram = NULL;
  static const char *const ids[] = { "12", "3", "main", "4", "11", "10", "8" };
  for (guint i = 0; i < G_N_ELEMENTS (ids); i++)
    {
      HlCyclePoint point = { .id = ids[i], .stream = (int) i, .m = 1.0 };
      g_assert_cmpint (hl_fluid_state_px (hl_fluid_water (), 1e5, 0.5, &point.state), ==, HL_OK);
      g_array_append_val (cycle->points, point);
    }
  diagram = hl_state_diagram_from_cycle (cycle, 960.0, 600.0);
  g_assert_cmpuint (diagram->marks->len, ==, 1);
  g_assert_cmpstr (mark_at (diagram, 0)->text, ==, "3, 4, 8, 10–12, main");
}

static void
test_isobars_of_close_pressures_merge (void)
{
  g_autoptr (HlCycle) cycle = cycle_industry (HL_UNITS_METRIC);
  g_autoptr (HlStateDiagram) diagram = hl_state_diagram_from_cycle (cycle, 960.0, 600.0);
  /* 65 bar before and 62.4 bar behind the valve: one, named by the live steam. */
  g_assert_true (has_text (diagram, "65 bar"));
  g_assert_false (has_text (diagram, "62.4 bar"));
  g_assert_true (has_text (diagram, "0.07 bar"));
}

static void
test_every_state_is_inside_and_found (void)
{
  for (guint32 seed = 100; seed < 130; seed++)
    {
      g_autoptr (HlCycle) cycle = cycle_random (seed, 12);
      g_autoptr (HlStateDiagram) diagram = hl_state_diagram_from_cycle (cycle, 900.0, 500.0);
      for (guint i = 0; i < cycle->points->len; i++)
        {
          const HlState *state = &cycle_point (cycle, i)->state;
          double x, y, other_x, other_y;
          int found;
          hl_state_diagram_to_pixel (diagram, state->s, state->T, &x, &y);
          g_assert_true (x >= diagram->frame.x && x <= diagram->frame.x + diagram->frame.width);
          g_assert_true (y >= diagram->frame.y && y <= diagram->frame.y + diagram->frame.height);
          found = hl_state_diagram_stream_at (diagram, x, y, 8.0);
          g_assert_cmpint (found, >=, 0);
          /* The one found is this one or one that its dot stands for. */
          hl_state_diagram_to_pixel (diagram, cycle_point (cycle, (guint) found)->state.s, cycle_point (cycle, (guint) found)->state.T, &other_x, &other_y);
          g_assert_cmpfloat (hypot (other_x - x, other_y - y), <, 2.0 * diagram->number_size);
        }
    }
}

static void
test_pointer_finds_dot_and_number_and_nothing_else (void)
{
  g_autoptr (HlCycle) cycle = cycle_simple (HL_UNITS_METRIC);
  g_autoptr (HlStateDiagram) diagram = hl_state_diagram_from_cycle (cycle, 960.0, 600.0);
  for (guint i = 0; i < diagram->marks->len; i++)
    {
      const HlMark *mark = mark_at (diagram, i);
      if (mark->kind != HL_MARK_STATE)
        continue;
      g_assert_cmpint (hl_state_diagram_stream_at (diagram, mark->at.x, mark->at.y, 0.0), ==, mark->streams[0]);
      g_assert_cmpint (hl_state_diagram_stream_at (diagram, mark->label.box.x + 1.0, mark->label.box.y + 1.0, 0.0), ==, mark->streams[0]);
      g_assert_cmpint (hl_state_diagram_stream_at (diagram, mark->at.x + mark->radius + 3.0, mark->at.y + 1.0, 5.0), ==, mark->streams[0]);
    }
  g_assert_cmpint (hl_state_diagram_stream_at (diagram, 400.0, 200.0, 8.0), ==, -1);
  g_assert_cmpint (hl_state_diagram_stream_at (diagram, -50.0, -50.0, 8.0), ==, -1);
}

static void
test_pixels_and_states_are_inverse (void)
{
  g_autoptr (HlCycle) cycle = cycle_simple (HL_UNITS_US);
  g_autoptr (HlStateDiagram) diagram = hl_state_diagram_from_cycle (cycle, 700.0, 300.0);
  double s = 0.0, T = 0.0, x, y;
  hl_state_diagram_to_pixel (diagram, 4000.0, 400.0, &x, &y);
  g_assert_true (hl_state_diagram_to_state (diagram, x, y, &s, &T));
  g_assert_cmpfloat_with_epsilon (s, 4000.0, 1e-6);
  g_assert_cmpfloat_with_epsilon (T, 400.0, 1e-6);
  g_assert_false (hl_state_diagram_to_state (diagram, 2.0, 2.0, &s, &T));
  g_assert_false (hl_state_diagram_to_state (diagram, 350.0, 299.0, &s, &T));
}

static cairo_surface_t *
picture_of (const HlStateDiagram *diagram, gboolean is_stale, int selected)
{
  cairo_surface_t *surface = cairo_image_surface_create (CAIRO_FORMAT_RGB24, (int) diagram->width, (int) diagram->height);
  cairo_t *cr = cairo_create (surface);
  hl_state_diagram_draw (diagram, cr, hl_theme (HL_THEME_LIGHT), is_stale, selected);
  cairo_destroy (cr);
  cairo_surface_flush (surface);
  return surface;
}

/* Pixels whose channels differ by more than @by: coloured ink. */
static guint
n_coloured (cairo_surface_t *surface, int by)
{
  const unsigned char *data = cairo_image_surface_get_data (surface);
  int stride = cairo_image_surface_get_stride (surface);
  guint n = 0;
  for (int y = 0; y < cairo_image_surface_get_height (surface); y++)
    for (int x = 0; x < cairo_image_surface_get_width (surface); x++)
      {
        const unsigned char *channel = data + y * stride + 4 * x;
        int high = MAX (MAX (channel[0], channel[1]), channel[2]), low = MIN (MIN (channel[0], channel[1]), channel[2]);
        n += high - low > by;
      }
  return n;
}

static void
test_stale_is_grey_and_selection_is_ringed (void)
{
  g_autoptr (HlCycle) cycle = cycle_simple (HL_UNITS_METRIC);
  g_autoptr (HlStateDiagram) diagram = hl_state_diagram_from_cycle (cycle, 700.0, 300.0);
  cairo_surface_t *live = picture_of (diagram, FALSE, -1), *stale = picture_of (diagram, TRUE, -1), *selected = picture_of (diagram, TRUE, 0);
  g_assert_cmpuint (n_coloured (live, 60), >, 1000);
  g_assert_cmpuint (n_coloured (stale, 60), ==, 0);
  g_assert_cmpuint (n_coloured (selected, 60), >, 20);
  cairo_surface_destroy (live);
  cairo_surface_destroy (stale);
  cairo_surface_destroy (selected);
}

static void
test_the_same_cycle_gives_the_same_picture (void)
{
  g_autoptr (HlCycle) cycle = cycle_industry (HL_UNITS_METRIC);
  g_autoptr (HlStateDiagram) one = hl_state_diagram_from_cycle (cycle, 700.0, 400.0), other = hl_state_diagram_from_cycle (cycle, 700.0, 400.0);
  cairo_surface_t *picture = picture_of (one, FALSE, -1), *again = picture_of (other, FALSE, -1);
  g_assert_cmpmem (cairo_image_surface_get_data (picture), (gsize) (400 * cairo_image_surface_get_stride (picture)),
                   cairo_image_surface_get_data (again), (gsize) (400 * cairo_image_surface_get_stride (again)));
  cairo_surface_destroy (picture);
  cairo_surface_destroy (again);
}

int
main (int argc, char **argv)
{
  g_test_init (&argc, &argv, NULL);
  g_test_add_func ("/draw/state-diagram/texts-of-whole-plants", test_texts_of_whole_plants);
  g_test_add_func ("/draw/state-diagram/texts-of-random-states", test_texts_of_random_states);
  g_test_add_func ("/draw/state-diagram/a-crowd-gives-way", test_a_crowd_gives_way);
  g_test_add_func ("/draw/state-diagram/an-empty-plant", test_an_empty_plant_shows_dome_and_pressures);
  g_test_add_func ("/draw/state-diagram/other-kinds", test_other_kinds);
  g_test_add_func ("/draw/state-diagram/lines-of-other-kinds", test_lines_of_other_kinds);
  g_test_add_func ("/draw/state-diagram/ideal-drop-of-ph", test_ideal_drop_of_ph);
  g_test_add_func ("/draw/state-diagram/words-of-the-kinds", test_words_of_the_kinds);
  g_test_add_func ("/draw/state-diagram/numbers-pressures-and-ideal-points", test_numbers_pressures_and_ideal_points);
  g_test_add_func ("/draw/state-diagram/runs-are-drawn-together", test_runs_of_coinciding_states_are_drawn_together);
  g_test_add_func ("/draw/state-diagram/isobars-of-close-pressures-merge", test_isobars_of_close_pressures_merge);
  g_test_add_func ("/draw/state-diagram/every-state-is-inside-and-found", test_every_state_is_inside_and_found);
  g_test_add_func ("/draw/state-diagram/pointer-finds-dot-and-number", test_pointer_finds_dot_and_number_and_nothing_else);
  g_test_add_func ("/draw/state-diagram/pixels-and-states-are-inverse", test_pixels_and_states_are_inverse);
  g_test_add_func ("/draw/state-diagram/stale-is-grey", test_stale_is_grey_and_selection_is_ringed);
  g_test_add_func ("/draw/state-diagram/the-same-cycle-gives-the-same-picture", test_the_same_cycle_gives_the_same_picture);
  return g_test_run ();
}
