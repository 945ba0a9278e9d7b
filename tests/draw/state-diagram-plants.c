/* State diagrams of solved plants: the right states and processes go in, and every picture is clean.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "diagram-checks.h"
#include "../engine/plants.h"
#include <math.h>
#include <string.h>

static HlPlant *
plant_of (guint n)
{
  switch (n)
    {
    case 0:
      return test_plant (test_simple_loop);
    case 1:
      return test_plant (test_reheat_plant);
    case 2:
      return test_plant (test_large_plant);
    default:
      return test_plant_set (test_plant (test_industrial_plant), "U1.heat", 8e6);
    }
}

#define N_PLANTS 4

static gboolean
cycle_has (const HlCycle *cycle, const char *id)
{
  for (guint i = 0; i < cycle->points->len; i++)
    if (strcmp (g_array_index (cycle->points, HlCyclePoint, i).id, id) == 0)
      return TRUE;
  return FALSE;
}

static void
test_pictures_of_plants_are_clean (void)
{
  for (guint n = 0; n < N_PLANTS; n++)
    {
      g_autoptr (HlPlant) plant = plant_of (n);
      g_autoptr (HlSolution) solution = hl_solve (plant, NULL);
      test_assert_solved (solution);
      for (guint i = 0; i < G_N_ELEMENTS (diagram_sizes); i++)
        for (int units = 0; units < HL_N_UNIT_SETS; units++)
          {
            g_autoptr (HlStateDiagram) diagram = hl_state_diagram_new (solution, (HlUnitSet) units, diagram_sizes[i].width, diagram_sizes[i].height);
            check_diagram (diagram);
            g_assert_cmpuint (n_without_number (diagram), ==, 0);
          }
    }
}

/* Those that come with the program, whatever their number. */
static void
test_pictures_of_example_plants_are_clean (void)
{
  g_autofree char *folder = g_test_build_filename (G_TEST_DIST, "..", "data", "examples", NULL);
  g_autoptr (GDir) dir = g_dir_open (folder, 0, NULL);
  const char *name;
  guint n = 0;
  g_assert_nonnull (dir);
  while ((name = g_dir_read_name (dir)) != NULL)
    {
      g_autofree char *path = g_build_filename (folder, name, NULL);
      g_autoptr (GError) error = NULL;
      g_autoptr (HlPlant) plant = NULL;
      g_autoptr (HlSolution) solution = NULL;
      if (!g_str_has_suffix (name, ".heatloom"))
        continue;
      plant = hl_plant_load (path, &error);
      g_assert_no_error (error);
      solution = hl_solve (plant, NULL);
      test_assert_solved (solution);
      for (guint i = 0; i < HL_N_STATE_DIAGRAMS * G_N_ELEMENTS (diagram_sizes); i++)
        {
          HlStateDiagramKind kind = (HlStateDiagramKind) (i / G_N_ELEMENTS (diagram_sizes));
          guint size = i % G_N_ELEMENTS (diagram_sizes);
          g_autoptr (HlStateDiagram) diagram = hl_state_diagram_new_of_kind (solution, kind, hl_plant_units (plant), diagram_sizes[size].width, diagram_sizes[size].height);
          check_diagram (diagram);
          g_assert_cmpuint (n_without_number (diagram), ==, 0);
          g_assert_cmpuint (diagram->marks->len, >, 2);
        }
      n++;
    }
  g_assert_cmpuint (n, >=, 3);
}

static void
test_every_stream_of_the_cycle_is_found_at_its_state (void)
{
  for (guint n = 0; n < N_PLANTS; n++)
    {
      g_autoptr (HlPlant) plant = plant_of (n);
      g_autoptr (HlSolution) solution = hl_solve (plant, NULL);
      g_autoptr (HlStateDiagram) diagram = hl_state_diagram_new (solution, HL_UNITS_METRIC, 960.0, 600.0);
      g_autoptr (HlCycle) cycle = hl_cycle_from_solution (solution, HL_UNITS_METRIC);
      g_assert_cmpuint (cycle->points->len, >, 3);
      for (guint i = 0; i < cycle->points->len; i++)
        {
          const HlCyclePoint *point = &g_array_index (cycle->points, HlCyclePoint, i);
          HlStreamResult result, other;
          double x, y, other_x, other_y;
          int found;
          hl_solution_stream (solution, (guint) point->stream, &result);
          g_assert_cmpstr (hl_plant_stream (plant, (guint) point->stream)->id, ==, point->id);
          hl_state_diagram_to_pixel (diagram, result.state.s, result.state.T, &x, &y);
          found = hl_state_diagram_stream_at (diagram, x, y, 6.0);
          g_assert_cmpint (found, >=, 0);
          hl_solution_stream (solution, (guint) found, &other);
          hl_state_diagram_to_pixel (diagram, other.state.s, other.state.T, &other_x, &other_y);
          g_assert_cmpfloat (hypot (other_x - x, other_y - y), <, 2.0 * diagram->number_size);
        }
    }
}

/* Streams 14 and 15 of the industrial plant are cooling water in lines of its own. */
static void
test_cooling_water_stays_out (void)
{
  g_autoptr (HlPlant) plant = plant_of (3);
  g_autoptr (HlSolution) solution = hl_solve (plant, NULL);
  g_autoptr (HlCycle) cycle = hl_cycle_from_solution (solution, HL_UNITS_METRIC);
  g_assert_cmpstr (hl_plant_stream_at (plant, "C1", "cooling_inlet")->id, ==, "14");
  g_assert_false (cycle_has (cycle, "14"));
  g_assert_false (cycle_has (cycle, "15"));
  g_assert_true (cycle_has (cycle, "7"));
  /* Make-up comes into the cycle and belongs to it. */
  g_assert_true (cycle_has (cycle, "11"));
  for (guint i = 0; i < cycle->processes->len; i++)
    g_assert_false (g_array_index (cycle->processes, HlProcess, i).is_service);
}

static void
test_processes_join_the_states_of_their_streams (void)
{
  g_autoptr (HlPlant) plant = plant_of (2);
  g_autoptr (HlSolution) solution = hl_solve (plant, NULL);
  g_autoptr (HlCycle) cycle = hl_cycle_from_solution (solution, HL_UNITS_METRIC);
  guint n_ideal = 0;
  for (guint i = 0; i < cycle->processes->len; i++)
    {
      const HlProcess *process = &g_array_index (cycle->processes, HlProcess, i);
      HlStreamResult result;
      if (process->from_stream >= 0)
        {
          hl_solution_stream (solution, (guint) process->from_stream, &result);
          g_assert_cmpfloat_with_epsilon (process->from.h, result.state.h, 1e-6);
        }
      if (process->has_isentropic)
        {
          g_assert_cmpfloat (fabs (process->isentropic.s - process->from.s), <, 1e-6 * fabs (process->from.s));
          n_ideal++;
        }
    }
  /* One group of the first turbine, three of the second, five of the third, two pumps. */
  g_assert_cmpuint (n_ideal, ==, 1 + 3 + 5 + 2);
}

/* Whatever is typed, solved or not, the picture stays a picture. */
static void
test_random_values_give_clean_pictures (void)
{
  guint n_solved = 0;
  for (int i = 0; i < 60; i++)
    {
      static const char *const addresses[] = { "T1.inlet.p", "B1.steam.T", "T2.exhaust.p", "T2.isentropic_efficiency", "T1.extraction1.p" };
      const double values[] = {
        exp (g_test_rand_double_range (log (40e5), log (300e5))), g_test_rand_double_range (650.0, 880.0),
        exp (g_test_rand_double_range (log (3000.0), log (1e5))), g_test_rand_double_range (0.5, 0.95), exp (g_test_rand_double_range (log (10e5), log (60e5))),
      };
      HlPlant *plant = plant_of (1);
      g_autoptr (HlSolution) solution = NULL;
      guint size = (guint) i % G_N_ELEMENTS (diagram_sizes);
      for (guint k = 0; k < G_N_ELEMENTS (addresses); k++)
        plant = test_plant_set (plant, addresses[k], values[k]);
      solution = hl_solve (plant, NULL);
      n_solved += hl_solution_is_solved (solution);
      {
        g_autoptr (HlStateDiagram) diagram = hl_state_diagram_new (solution, HL_UNITS_METRIC, diagram_sizes[size].width, diagram_sizes[size].height);
        check_diagram (diagram);
        g_assert_cmpuint (n_without_number (diagram), ==, 0);
      }
      hl_plant_unref (plant);
    }
  g_test_message ("%u of 60 solved", n_solved);
  g_assert_cmpuint (n_solved, >, 0);
}

static void
test_a_plant_without_streams_shows_the_dome (void)
{
  g_autoptr (HlPlant) plant = hl_plant_new ();
  g_autoptr (HlSolution) solution = hl_solve (plant, NULL);
  g_autoptr (HlStateDiagram) diagram = hl_state_diagram_new (solution, HL_UNITS_SI, 700.0, 300.0);
  check_diagram (diagram);
  g_assert_cmpuint (diagram->marks->len, ==, 0);
  g_assert_cmpuint (hl_plot_series_n (diagram->outline), >, 100);
}

int
main (int argc, char **argv)
{
  g_test_init (&argc, &argv, NULL);
  g_test_add_func ("/draw/state-diagram-plants/pictures-are-clean", test_pictures_of_plants_are_clean);
  g_test_add_func ("/draw/state-diagram-plants/pictures-of-examples-are-clean", test_pictures_of_example_plants_are_clean);
  g_test_add_func ("/draw/state-diagram-plants/every-stream-is-found", test_every_stream_of_the_cycle_is_found_at_its_state);
  g_test_add_func ("/draw/state-diagram-plants/cooling-water-stays-out", test_cooling_water_stays_out);
  g_test_add_func ("/draw/state-diagram-plants/processes-join-their-states", test_processes_join_the_states_of_their_streams);
  g_test_add_func ("/draw/state-diagram-plants/random-values", test_random_values_give_clean_pictures);
  g_test_add_func ("/draw/state-diagram-plants/a-plant-without-streams", test_a_plant_without_streams_shows_the_dome);
  return g_test_run ();
}
