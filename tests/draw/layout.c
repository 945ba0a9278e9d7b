/* Lines and words of whole plants: orthogonal, from port to port, clear of symbols and of one another.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "draw/layout.h"
#include <math.h>
#include <string.h>
#include "demo-plants.h"
#include "solution-fixture.h"

static HlBox
box_of (const HlComponent *component, double grow)
{
  int w, h;
  hl_component_half_size (component, &w, &h);
  return (HlBox) { (component->x - w) * HL_UNIT - grow, (component->y - h) * HL_UNIT - grow, 2 * w * HL_UNIT + 2 * grow, 2 * h * HL_UNIT + 2 * grow };
}

static gboolean
overlap (const HlBox *a, const HlBox *b)
{
  return a->x < b->x + b->width && b->x < a->x + a->width && a->y < b->y + b->height && b->y < a->y + a->height;
}

static HlBox
box_of_piece (const HlPoint *a)
{
  return (HlBox) { MIN (a[0].x, a[1].x), MIN (a[0].y, a[1].y), fabs (a[1].x - a[0].x), fabs (a[1].y - a[0].y) };
}

static void
check_end (const HlPlant *plant, const char *id, const char *port, const HlPoint *end, const HlPoint *next)
{
  static const int out_x[4] = { 1, 0, -1, 0 }, out_y[4] = { 0, 1, 0, -1 };
  const HlComponent *component = hl_plant_find_component (plant, id);
  HlSide side;
  guint n;
  int x, y;
  g_assert_true (hl_component_find_port (component, port, &n));
  hl_component_port_place (component, n, &x, &y, &side);
  g_assert_cmpfloat (end->x, ==, x * HL_UNIT);
  g_assert_cmpfloat (end->y, ==, y * HL_UNIT);
  g_assert_cmpfloat ((next->x - end->x) * out_x[side] + (next->y - end->y) * out_y[side], >, 0.0);
}

/* The part of the own box between port and edge is the line's way out; foreign boxes it never enters. */
static void
check_clear_of_symbols (const HlPlant *plant, const HlStream *stream, const HlStreamPlace *place)
{
  for (guint i = 0; i < hl_plant_n_components (plant); i++)
    {
      const HlComponent *component = hl_plant_component (plant, i);
      HlBox box = box_of (component, -1.0);
      gboolean is_from = component->id == stream->from_id, is_to = component->id == stream->to_id;
      for (guint k = 0; k + 1 < place->n_points; k++)
        {
          HlBox piece = box_of_piece (&place->points[k]);
          if ((is_from && k == 0) || (is_to && k + 2 == place->n_points))
            continue;
          g_test_message ("stream %s piece %u, component %s", stream->id, k, component->id);
          g_assert_false (overlap (&box, &piece));
        }
    }
}

static void
check_lines (const HlPlant *plant, const HlLayout *layout)
{
  for (guint i = 0; i < hl_plant_n_streams (plant); i++)
    {
      const HlStream *stream = hl_plant_stream (plant, i);
      const HlStreamPlace *place = hl_layout_stream (layout, i);
      g_assert_cmpuint (place->n_points, >=, 2);
      check_end (plant, stream->from_id, stream->from_port, &place->points[0], &place->points[1]);
      check_end (plant, stream->to_id, stream->to_port, &place->points[place->n_points - 1], &place->points[place->n_points - 2]);
      for (guint k = 0; k + 1 < place->n_points; k++)
        {
          HlBox piece = box_of_piece (&place->points[k]);
          g_assert_true ((piece.width > 0.0) != (piece.height > 0.0));
          if (k > 0)    /* corners only where the line bends */
            g_assert_true ((place->points[k].x == place->points[k + 1].x) != (place->points[k].x == place->points[k - 1].x));
        }
      check_clear_of_symbols (plant, stream, place);
    }
}

/* Pixels that two lines run along on each other. */
static double
shared_length (const HlPlant *plant, const HlLayout *layout)
{
  double shared = 0.0;
  for (guint i = 0; i < hl_plant_n_streams (plant); i++)
    for (guint j = i + 1; j < hl_plant_n_streams (plant); j++)
      {
        const HlStreamPlace *a = hl_layout_stream (layout, i), *b = hl_layout_stream (layout, j);
        for (guint k = 0; k + 1 < a->n_points; k++)
          for (guint l = 0; l + 1 < b->n_points; l++)
            {
              HlBox p = box_of_piece (&a->points[k]), q = box_of_piece (&b->points[l]);
              if (p.width > 0.0 && q.width > 0.0 && p.y == q.y)
                shared += MAX (MIN (p.x + p.width, q.x + q.width) - MAX (p.x, q.x), 0.0);
              else if (p.height > 0.0 && q.height > 0.0 && p.x == q.x)
                shared += MAX (MIN (p.y + p.height, q.y + q.height) - MAX (p.y, q.y), 0.0);
            }
      }
  return shared;
}

static HlPlant *
demo (int n)
{
  switch (n)
    {
    case 0:  return hl_demo_simple_loop ();
    case 1:  return hl_demo_extraction ();
    case 2:  return hl_demo_reheat ();
    case 3:  return hl_demo_heater_row (6);
    case 4:  return hl_demo_repeated (4);
    default: return NULL;
    }
}

static void
test_lines_of_demo_plants (void)
{
  HlPlant *plant;
  for (int n = 0; (plant = demo (n)) != NULL; n++)
    {
      g_autoptr (HlLayout) layout = hl_layout_new (plant, NULL, hl_theme (HL_THEME_PAPER));
      check_lines (plant, layout);
      g_assert_cmpfloat (shared_length (plant, layout), <=, 0.0);
      hl_plant_unref (plant);
    }
}

static void
test_lines_of_random_plants (void)
{
  guint n_streams = 0;
  for (guint32 seed = 0; seed < 40; seed++)
    {
      g_autoptr (HlPlant) plant = hl_demo_random (seed, 12 + seed);
      g_autoptr (HlLayout) layout = hl_layout_new (plant, NULL, hl_theme (HL_THEME_PAPER));
      g_test_message ("seed %u", seed);
      check_lines (plant, layout);
      g_assert_cmpfloat (shared_length (plant, layout), <=, 0.0);
      n_streams += hl_plant_n_streams (plant);
    }
  g_assert_cmpuint (n_streams, >, 300);    /* the plants do have lines */
}

static void
test_simple_loop_has_few_bends (void)
{
  g_autoptr (HlPlant) plant = hl_demo_simple_loop ();
  g_autoptr (HlLayout) layout = hl_layout_new (plant, NULL, hl_theme (HL_THEME_PAPER));
  guint n_bends = 0;
  for (guint i = 0; i < hl_plant_n_streams (plant); i++)
    {
      n_bends += hl_layout_stream (layout, i)->n_points - 2;
      g_assert_cmpuint (hl_layout_stream (layout, i)->n_arcs, ==, 0);
    }
  g_assert_cmpuint (n_bends, <=, 2 + 2 + 1 + 1);    /* by hand: over the top 2, exhaust 2 (or 0), corners 1 and 1 */
}

/* Each crossing of a horizontal and a vertical piece, inside both, has its arc; and there are no others. */
static void
test_each_crossing_has_an_arc (void)
{
  HlPlant *plant;
  for (int n = 0; (plant = demo (n)) != NULL; n++)
    {
      g_autoptr (HlLayout) layout = hl_layout_new (plant, NULL, hl_theme (HL_THEME_PAPER));
      for (guint i = 0; i < hl_plant_n_streams (plant); i++)
        {
          const HlStreamPlace *a = hl_layout_stream (layout, i);
          guint n_crossings = 0;
          for (guint k = 0; k + 1 < a->n_points; k++)
            for (guint j = 0; j < hl_plant_n_streams (plant); j++)
              {
                const HlStreamPlace *b = hl_layout_stream (layout, j);
                HlBox p = box_of_piece (&a->points[k]);
                for (guint l = 0; l + 1 < b->n_points && p.width > 0.0; l++)
                  {
                    HlBox q = box_of_piece (&b->points[l]);
                    n_crossings += q.height > 0.0 && q.x > p.x && q.x < p.x + p.width && p.y > q.y && p.y < q.y + q.height;
                  }
              }
          g_assert_cmpuint (a->n_arcs, ==, n_crossings);
        }
      hl_plant_unref (plant);
    }
}

static void
check_words (const HlPlant *plant, const HlLayout *layout)
{
  g_autoptr (GArray) boxes = g_array_new (FALSE, FALSE, sizeof (HlBox));
  for (guint i = 0; i < hl_plant_n_components (plant); i++)
    g_array_append_val (boxes, hl_layout_component (layout, i)->title);
  for (guint i = 0; i < hl_plant_n_streams (plant); i++)
    {
      const HlStreamPlace *place = hl_layout_stream (layout, i);
      g_assert_cmpfloat (place->label.width, >, 0.0);
      g_assert_nonnull (place->label_lines[0]);
      g_assert_nonnull (place->label_lines[1]);
      g_array_append_val (boxes, place->label);
    }
  for (guint i = 0; i < boxes->len; i++)
    {
      const HlBox *a = &g_array_index (boxes, HlBox, i);
      for (guint j = i + 1; j < boxes->len; j++)
        {
          g_test_message ("words %u and %u", i, j);
          g_assert_false (overlap (a, &g_array_index (boxes, HlBox, j)));
        }
      for (guint k = 0; k < hl_plant_n_components (plant); k++)
        {
          HlBox symbol = box_of (hl_plant_component (plant, k), 0.0);
          g_test_message ("words %u and symbol %s", i, hl_plant_component (plant, k)->id);
          g_assert_false (overlap (a, &symbol));
        }
    }
}

static void
test_words_overlap_nothing (void)
{
  HlPlant *plant;
  for (int n = 0; (plant = demo (n)) != NULL; n++)
    for (int theme = 0; theme < HL_N_THEMES; theme++)
      {
        g_autoptr (HlSolution) solution = hl_fixture_solution (plant, TRUE);
        g_autoptr (HlLayout) layout = hl_layout_new (plant, solution, hl_theme (theme));
        g_test_message ("demo %d", n);
        check_words (plant, layout);
        if (theme == HL_N_THEMES - 1)
          hl_plant_unref (plant);
      }
}

static void
test_words_say_flow_and_state (void)
{
  g_autoptr (HlPlant) plant = hl_demo_simple_loop ();
  g_autoptr (HlSolution) solution = hl_fixture_solution (plant, TRUE);
  g_autoptr (HlLayout) layout = hl_layout_new (plant, solution, hl_theme (HL_THEME_PAPER));
  g_assert_cmpstr (hl_layout_stream (layout, 0)->label_lines[0], ==, "16.67 kg/s");
  g_assert_cmpstr (hl_layout_stream (layout, 0)->label_lines[1], ==, "65 bar · 485.0 °C");
  g_assert_cmpstr (hl_layout_stream (layout, 1)->label_lines[1], ==, "0.07 bar · x 0.884");
  g_assert_cmpint (hl_layout_stream (layout, 1)->look, ==, HL_LOOK_WET);
  g_assert_cmpstr (hl_layout_component (layout, 0)->title_lines[0], ==, "B1 heat");
  g_assert_cmpstr (hl_layout_component (layout, 1)->title_lines[1], ==, "14.89 MW · η 0.830");
}

static void
test_cooling_water_is_told_from_feed_water (void)
{
  g_autoptr (HlPlant) plant = hl_demo_reheat ();
  g_autoptr (HlSolution) solution = hl_fixture_solution (plant, TRUE);
  g_autoptr (HlLayout) layout = hl_layout_new (plant, solution, hl_theme (HL_THEME_PAPER));
  for (guint i = 0; i < hl_plant_n_streams (plant); i++)
    {
      const HlStream *stream = hl_plant_stream (plant, i);
      gboolean is_cooling = g_str_has_prefix (stream->from_port, "cooling_") || g_str_has_prefix (stream->to_port, "cooling_");
      g_assert_cmpint (hl_layout_stream (layout, i)->look == HL_LOOK_COOLING, ==, is_cooling);
    }
}

static void
test_hand_set_label_place_wins (void)
{
  g_autoptr (HlPlant) first = hl_demo_simple_loop ();
  HlStream *stream = hl_stream_copy (hl_plant_stream (first, 0));
  g_autoptr (HlPlant) plant = NULL;
  g_autoptr (HlSolution) solution = NULL;
  g_autoptr (HlLayout) layout = NULL;
  const HlStreamPlace *place;
  stream->has_label_place = TRUE;
  stream->label_x = 18;
  stream->label_y = -3;
  plant = hl_plant_with_stream (first, stream);
  solution = hl_fixture_solution (plant, TRUE);
  layout = hl_layout_new (plant, solution, hl_theme (HL_THEME_PAPER));
  place = hl_layout_stream (layout, 0);
  g_assert_cmpfloat_with_epsilon (place->label.x + place->label.width / 2.0, 180.0, 1e-9);
  g_assert_cmpfloat_with_epsilon (place->label.y + place->label.height / 2.0, -30.0, 1e-9);
  g_assert_true (place->has_leader);    /* it lies away from its line */
}

static HlPlant *
moved (const HlPlant *plant, const char *id, int dx, int dy)
{
  HlComponent *component = hl_component_copy (hl_plant_find_component (plant, id));
  component->x += dx;
  component->y += dy;
  return hl_plant_with_component (plant, component);
}

static gboolean
is_same_line (const HlStreamPlace *a, const HlStreamPlace *b)
{
  return a->n_points == b->n_points && memcmp (a->points, b->points, a->n_points * sizeof (HlPoint)) == 0;
}

static void
test_next_keeps_what_is_not_touched (void)
{
  g_autoptr (HlPlant) plant = hl_demo_repeated (4);
  g_autoptr (HlPlant) other = moved (plant, "G10", 4, -2);
  g_autoptr (HlSolution) solution = hl_fixture_solution (plant, TRUE);
  g_autoptr (HlLayout) layout = hl_layout_new (plant, solution, hl_theme (HL_THEME_PAPER));
  g_autoptr (HlLayout) same = hl_layout_next (layout, plant, solution, hl_theme (HL_THEME_PAPER));
  g_autoptr (HlLayout) next = hl_layout_next (layout, other, solution, hl_theme (HL_THEME_PAPER));
  for (guint i = 0; i < hl_plant_n_streams (plant); i++)
    {
      const HlStreamPlace *before = hl_layout_stream (layout, i);
      g_assert_true (is_same_line (before, hl_layout_stream (same, i)));
      g_assert_true (is_same_line (before, hl_layout_stream (next, i)));    /* a generator has no stream */
      g_assert_cmpmem (&before->label, sizeof (HlBox), &hl_layout_stream (same, i)->label, sizeof (HlBox));
    }
}

static void
test_next_follows_what_moves (void)
{
  g_autoptr (HlPlant) plant = hl_demo_extraction ();
  g_autoptr (HlSolution) solution = hl_fixture_solution (plant, TRUE);
  g_autoptr (HlLayout) layout = hl_layout_new (plant, solution, hl_theme (HL_THEME_PAPER));
  static const int steps[][2] = { { 1, 0 }, { 3, 2 }, { -4, 11 }, { 2, -14 }, { 12, 3 } };
  for (guint i = 0; i < G_N_ELEMENTS (steps); i++)
    {
      HlPlant *next_plant = moved (plant, "C1", steps[i][0], steps[i][1]);
      HlLayout *next = hl_layout_next (layout, next_plant, solution, hl_theme (HL_THEME_PAPER));
      check_lines (next_plant, next);
      hl_layout_unref (g_steal_pointer (&layout));
      hl_plant_unref (g_steal_pointer (&plant));
      layout = next;
      plant = next_plant;
    }
}

/* The picture of a preview: a plant with a stream that the shown solution does not know yet. */
static void
test_solution_of_a_smaller_plant (void)
{
  g_autoptr (HlPlant) plant = hl_demo_simple_loop ();
  g_autoptr (HlSolution) solution = hl_fixture_solution (plant, TRUE);
  g_autoptr (HlPlant) larger = hl_demo_extraction ();
  g_autoptr (HlLayout) layout = hl_layout_new (larger, solution, hl_theme (HL_THEME_PAPER));
  g_assert_nonnull (hl_layout_stream (layout, 0)->label_lines[0]);
  g_assert_null (hl_layout_stream (layout, 10)->label_lines[0]);
}

static void
test_finds_the_stream_at_a_point (void)
{
  g_autoptr (HlPlant) plant = hl_demo_simple_loop ();
  g_autoptr (HlSolution) solution = hl_fixture_solution (plant, TRUE);
  g_autoptr (HlLayout) layout = hl_layout_new (plant, solution, hl_theme (HL_THEME_PAPER));
  for (guint i = 0; i < hl_plant_n_streams (plant); i++)
    {
      const HlStreamPlace *place = hl_layout_stream (layout, i);
      double x = (place->points[0].x + 2.0 * place->points[1].x) / 3.0, y = (place->points[0].y + 2.0 * place->points[1].y) / 3.0;
      g_assert_cmpint (hl_layout_stream_at (layout, place->label.x + 5.0, place->label.y + 5.0, 4.0), ==, (int) i);
      g_assert_cmpint (hl_layout_stream_at (layout, x + 2.0, y + 2.0, 4.0), ==, (int) i);
    }
  g_assert_cmpint (hl_layout_stream_at (layout, -5000.0, -5000.0, 4.0), ==, -1);
}

static void
test_extents_hold_everything (void)
{
  g_autoptr (HlPlant) plant = hl_demo_reheat ();
  g_autoptr (HlSolution) solution = hl_fixture_solution (plant, TRUE);
  g_autoptr (HlLayout) layout = hl_layout_new (plant, solution, hl_theme (HL_THEME_PAPER));
  HlBox extents;
  hl_layout_extents (layout, &extents);
  for (guint i = 0; i < hl_plant_n_streams (plant); i++)
    {
      const HlBox *label = &hl_layout_stream (layout, i)->label;
      g_assert_true (label->x >= extents.x && label->y >= extents.y);
      g_assert_true (label->x + label->width <= extents.x + extents.width && label->y + label->height <= extents.y + extents.height);
    }
}

static void
test_shaft_runs_between_its_ends (void)
{
  g_autoptr (HlPlant) plant = hl_demo_reheat ();
  g_autoptr (HlLayout) layout = hl_layout_new (plant, NULL, hl_theme (HL_THEME_PAPER));
  g_assert_cmpuint (hl_layout_n_shafts (layout), ==, 2);    /* HP to LP, LP to generator */
  for (guint i = 0; i < 2; i++)
    {
      guint n;
      const HlPoint *points = hl_layout_shaft (layout, i, &n);
      g_assert_cmpuint (n, ==, 2);
      g_assert_cmpfloat (points[0].y, ==, 80.0);
      g_assert_cmpfloat (points[1].y, ==, 80.0);
      g_assert_cmpfloat (points[0].x, <, points[1].x);
    }
}

static void
test_preview_leads_from_port_to_pointer (void)
{
  g_autoptr (HlPlant) plant = hl_demo_simple_loop ();
  guint n;
  HlPoint *points = hl_route_preview (plant, "B1", "steam", 203.0, 298.0, &n);
  g_assert_cmpuint (n, >=, 2);
  g_assert_cmpfloat (points[0].x, ==, 80.0);
  g_assert_cmpfloat (points[0].y, ==, 170.0);
  g_assert_cmpfloat (points[n - 1].x, ==, 200.0);
  g_assert_cmpfloat (points[n - 1].y, ==, 300.0);
  g_free (points);
  g_assert_null (hl_route_preview (plant, "B1", "no such port", 0.0, 0.0, &n));
  g_assert_cmpuint (n, ==, 0);
}

static void
test_empty_and_vast_plants (void)
{
  g_autoptr (HlPlant) empty = hl_plant_new (), first = hl_demo_simple_loop (), vast = NULL;
  g_autoptr (HlLayout) layout = hl_layout_new (empty, NULL, hl_theme (HL_THEME_PAPER)), far = NULL;
  HlBox extents;
  hl_layout_extents (layout, &extents);
  g_assert_true (isfinite (extents.width) && extents.width >= 0.0);
  vast = moved (first, "C1", 3000000, 3000000);
  far = hl_layout_new (vast, NULL, hl_theme (HL_THEME_PAPER));
  for (guint i = 0; i < hl_plant_n_streams (vast); i++)
    g_assert_cmpuint (hl_layout_stream (far, i)->n_points, >=, 2);
}

int
main (int argc, char **argv)
{
  g_test_init (&argc, &argv, NULL);
  g_test_add_func ("/draw/layout/lines-of-demo-plants", test_lines_of_demo_plants);
  g_test_add_func ("/draw/layout/lines-of-random-plants", test_lines_of_random_plants);
  g_test_add_func ("/draw/layout/simple-loop-has-few-bends", test_simple_loop_has_few_bends);
  g_test_add_func ("/draw/layout/each-crossing-has-an-arc", test_each_crossing_has_an_arc);
  g_test_add_func ("/draw/layout/words-overlap-nothing", test_words_overlap_nothing);
  g_test_add_func ("/draw/layout/words-say-flow-and-state", test_words_say_flow_and_state);
  g_test_add_func ("/draw/layout/cooling-water-is-told-from-feed-water", test_cooling_water_is_told_from_feed_water);
  g_test_add_func ("/draw/layout/hand-set-label-place-wins", test_hand_set_label_place_wins);
  g_test_add_func ("/draw/layout/next-keeps-what-is-not-touched", test_next_keeps_what_is_not_touched);
  g_test_add_func ("/draw/layout/next-follows-what-moves", test_next_follows_what_moves);
  g_test_add_func ("/draw/layout/solution-of-a-smaller-plant", test_solution_of_a_smaller_plant);
  g_test_add_func ("/draw/layout/finds-the-stream-at-a-point", test_finds_the_stream_at_a_point);
  g_test_add_func ("/draw/layout/extents-hold-everything", test_extents_hold_everything);
  g_test_add_func ("/draw/layout/shaft-runs-between-its-ends", test_shaft_runs_between_its_ends);
  g_test_add_func ("/draw/layout/preview-leads-from-port-to-pointer", test_preview_leads_from_port_to_pointer);
  g_test_add_func ("/draw/layout/empty-and-vast-plants", test_empty_and_vast_plants);
  return g_test_run ();
}
