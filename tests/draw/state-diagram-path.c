/* Paths of processes: every sample lies where its law says, and the polyline is as good as the curve.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "cycle-fixtures.h"
#include <math.h>

typedef struct {
  HlCycle        *cycle;
  HlStateDiagram *diagram;
} Fixture;

static void
set_up (Fixture *fixture, gconstpointer data)
{
  double p = data != NULL ? *(const double *) data : 168e5;
  fixture->cycle = cycle_reheat (HL_UNITS_METRIC, p, 811.15);
  fixture->diagram = hl_state_diagram_from_cycle (fixture->cycle, 960.0, 600.0);
}

static void
tear_down (Fixture *fixture, gconstpointer data)
{
  (void) data;
  hl_state_diagram_free (fixture->diagram);
  hl_cycle_free (fixture->cycle);
}

static HlPoint
pixel (const Fixture *fixture, double s, double T)
{
  HlPoint at;
  hl_state_diagram_to_pixel (fixture->diagram, s, T, &at.x, &at.y);
  return at;
}

static double
distance_to_path (const Fixture *fixture, const GArray *path, HlPoint at)
{
  double nearest = G_MAXDOUBLE;
  for (guint i = 1; i < path->len; i++)
    {
      const HlPathPoint *one = &g_array_index (path, HlPathPoint, i - 1), *other = &g_array_index (path, HlPathPoint, i);
      HlPoint a = pixel (fixture, one->s, one->T), b = pixel (fixture, other->s, other->T);
      double dx = b.x - a.x, dy = b.y - a.y, square = dx * dx + dy * dy;
      double t = square > 0.0 ? CLAMP (((at.x - a.x) * dx + (at.y - a.y) * dy) / square, 0.0, 1.0) : 0.0;
      nearest = fmin (nearest, hypot (a.x + t * dx - at.x, a.y + t * dy - at.y));
    }
  return nearest;
}

static GArray *
path_of (const Fixture *fixture, const HlProcess *process)
{
  return hl_process_path (process, HL_STATE_DIAGRAM_TS, &fixture->diagram->x_axis, &fixture->diagram->y_axis);
}

/* What holds for every path: it starts and ends at its states, and T and s of a sample belong to its p and h. */
static void
assert_samples_are_states (const HlProcess *process, const GArray *path)
{
  const HlPathPoint *first = &g_array_index (path, HlPathPoint, 0), *last = &g_array_index (path, HlPathPoint, path->len - 1);
  g_assert_cmpuint (path->len, >=, 2);
  g_assert_cmpfloat_with_epsilon (first->s, process->from.s, 1e-9);
  g_assert_cmpfloat_with_epsilon (first->T, process->from.T, 1e-9);
  g_assert_cmpfloat_with_epsilon (last->s, process->to.s, 1e-9);
  g_assert_cmpfloat_with_epsilon (last->T, process->to.T, 1e-9);
  for (guint i = 0; i < path->len; i++)
    {
      const HlPathPoint *point = &g_array_index (path, HlPathPoint, i);
      HlState state;
      g_assert_cmpint (hl_fluid_state_ps (hl_fluid_water (), point->p, point->s, &state), ==, HL_OK);
      g_assert_cmpfloat (fabs (state.T - point->T), <, 1e-4);
      g_assert_cmpfloat (fabs (state.h - point->h), <, 1.0);
    }
}

static void
test_isobaric_samples_lie_on_their_isobar (Fixture *fixture, gconstpointer data)
{
  HlProcess process = { .kind = HL_PROCESS_HEATING, .fluid = hl_fluid_water () };
  static const double pressures[] = { 5000.0, 2e5, 65e5, 168e5, 215e5, 221e5, 230e5, 300e5 };
  (void) data;
  for (guint i = 0; i < G_N_ELEMENTS (pressures); i++)
    {
      GArray *path;
      g_assert_cmpint (hl_fluid_state_pT (hl_fluid_water (), pressures[i], 300.0, &process.from), ==, HL_OK);
      g_assert_cmpint (hl_fluid_state_pT (hl_fluid_water (), pressures[i], 850.0, &process.to), ==, HL_OK);
      path = path_of (fixture, &process);
      assert_samples_are_states (&process, path);
      for (guint k = 0; k < path->len; k++)
        g_assert_cmpfloat (fabs (g_array_index (path, HlPathPoint, k).p / pressures[i] - 1.0), <, 1e-12);
      /* The polyline against 500 states of its own, each within a quarter of a pixel. */
      for (int k = 0; k <= 500; k++)
        {
          HlState state;
          g_assert_cmpint (hl_fluid_state_ph (hl_fluid_water (), pressures[i], process.from.h + k / 500.0 * (process.to.h - process.from.h), &state), ==, HL_OK);
          g_assert_cmpfloat (distance_to_path (fixture, path, pixel (fixture, state.s, state.T)), <, 0.25);
        }
      g_array_unref (path);
    }
}

/* Through the dome at constant pressure the path is level, and its colour changes on the saturation line. */
static void
test_boiling_is_level_and_changes_colour_on_the_line (Fixture *fixture, gconstpointer data)
{
  HlProcess process = { .kind = HL_PROCESS_HEATING, .fluid = hl_fluid_water () };
  HlSaturation saturation;
  guint n_changes = 0;
  GArray *path;
  (void) data;
  g_assert_cmpint (hl_fluid_saturation_p (hl_fluid_water (), 20e5, &saturation), ==, HL_OK);
  g_assert_cmpint (hl_fluid_state_pT (hl_fluid_water (), 20e5, 310.0, &process.from), ==, HL_OK);
  g_assert_cmpint (hl_fluid_state_pT (hl_fluid_water (), 20e5, 700.0, &process.to), ==, HL_OK);
  path = path_of (fixture, &process);
  for (guint i = 0; i < path->len; i++)
    {
      const HlPathPoint *point = &g_array_index (path, HlPathPoint, i);
      if (point->look == HL_LOOK_WET)
        g_assert_cmpfloat_with_epsilon (point->T, saturation.T, 1e-9);
      if (i > 0 && point->look != g_array_index (path, HlPathPoint, i - 1).look)
        {
          double s = n_changes == 0 ? saturation.s_liquid : saturation.s_vapour;
          HlPoint here = pixel (fixture, point->s, point->T), line = pixel (fixture, s, saturation.T);
          g_assert_cmpfloat (hypot (here.x - line.x, here.y - line.y), <, 0.3);
          n_changes++;
        }
    }
  g_assert_cmpuint (n_changes, ==, 2);
  g_array_unref (path);
}

static void
test_pressure_loss_spreads_in_proportion (Fixture *fixture, gconstpointer data)
{
  HlProcess process = { .kind = HL_PROCESS_HEATING, .fluid = hl_fluid_water () };
  GArray *path;
  (void) data;
  g_assert_cmpint (hl_fluid_state_pT (hl_fluid_water (), 71e5, 400.0, &process.from), ==, HL_OK);
  g_assert_cmpint (hl_fluid_state_pT (hl_fluid_water (), 65e5, 758.15, &process.to), ==, HL_OK);
  path = path_of (fixture, &process);
  assert_samples_are_states (&process, path);
  for (guint i = 0; i < path->len; i++)
    {
      const HlPathPoint *point = &g_array_index (path, HlPathPoint, i);
      double share = (point->h - process.from.h) / (process.to.h - process.from.h);
      g_assert_cmpfloat (fabs (point->p - (71e5 - share * 6e5)), <, 20.0);
    }
  g_array_unref (path);
}

static void
test_expansion_keeps_its_efficiency (Fixture *fixture, gconstpointer data)
{
  static const double efficiencies[] = { 0.5, 0.85, 1.0 };
  (void) data;
  for (guint i = 0; i < G_N_ELEMENTS (efficiencies); i++)
    {
      HlProcess process = { .kind = HL_PROCESS_EXPANSION, .fluid = hl_fluid_water (), .has_isentropic = TRUE };
      gboolean has_wet = FALSE;
      GArray *path;
      g_assert_cmpint (hl_fluid_state_pT (hl_fluid_water (), 65e5, 758.15, &process.from), ==, HL_OK);
      g_assert_cmpint (hl_fluid_state_ps (hl_fluid_water (), 5000.0, process.from.s, &process.isentropic), ==, HL_OK);
      g_assert_cmpint (hl_fluid_state_ph (hl_fluid_water (), 5000.0,
                                          process.from.h - efficiencies[i] * (process.from.h - process.isentropic.h), &process.to), ==, HL_OK);
      path = path_of (fixture, &process);
      assert_samples_are_states (&process, path);
      for (guint k = 1; k < path->len; k++)
        {
          const HlPathPoint *point = &g_array_index (path, HlPathPoint, k);
          HlState ideal;
          g_assert_cmpint (hl_fluid_state_ps (hl_fluid_water (), point->p, process.from.s, &ideal), ==, HL_OK);
          g_assert_cmpfloat (fabs (process.from.h - point->h - efficiencies[i] * (process.from.h - ideal.h)), <, 0.5);
          has_wet = has_wet || point->look == HL_LOOK_WET;
        }
      /* Half the ideal drop leaves the steam dry. */
      g_assert_cmpint (has_wet, ==, efficiencies[i] > 0.6);
      g_array_unref (path);
    }
}

static void
test_throttling_keeps_enthalpy (Fixture *fixture, gconstpointer data)
{
  HlProcess process = { .kind = HL_PROCESS_THROTTLING, .fluid = hl_fluid_water () };
  GArray *path;
  (void) data;
  g_assert_cmpint (hl_fluid_state_px (hl_fluid_water (), 42e5, 0.0, &process.from), ==, HL_OK);
  g_assert_cmpint (hl_fluid_state_ph (hl_fluid_water (), 1e5, process.from.h, &process.to), ==, HL_OK);
  path = path_of (fixture, &process);
  assert_samples_are_states (&process, path);
  g_assert_cmpuint (path->len, >, 5);
  for (guint i = 0; i < path->len; i++)
    g_assert_cmpfloat (fabs (g_array_index (path, HlPathPoint, i).h - process.from.h), <, 1e-6 * process.from.h);
  g_array_unref (path);
}

/* Outside the formulation's range there is no path to follow: a straight line, no crash. */
static void
test_a_failing_path_becomes_straight (Fixture *fixture, gconstpointer data)
{
  HlProcess process = { .kind = HL_PROCESS_HEATING, .fluid = hl_fluid_water () };
  GArray *path;
  (void) data;
  g_assert_cmpint (hl_fluid_state_pT (hl_fluid_water (), 65e5, 400.0, &process.from), ==, HL_OK);
  process.to = process.from;
  process.to.p = 2e9;
  process.to.h += 1e6;
  process.to.s += 1000.0;
  path = path_of (fixture, &process);
  g_assert_cmpuint (path->len, ==, 2);
  g_assert_cmpfloat_with_epsilon (g_array_index (path, HlPathPoint, 1).s, process.to.s, 1e-9);
  g_array_unref (path);
}

static void
test_all_paths_of_a_plant (Fixture *fixture, gconstpointer data)
{
  (void) data;
  for (guint i = 0; i < fixture->cycle->processes->len; i++)
    {
      const HlProcess *process = &g_array_index (fixture->cycle->processes, HlProcess, i);
      GArray *path = path_of (fixture, process);
      assert_samples_are_states (process, path);
      g_array_unref (path);
    }
}

static void
test_isobars_from_boiling_to_the_top (Fixture *fixture, gconstpointer data)
{
  static const double pressures[] = { 7000.0, 65e5, 220e5, 250e5 };
  (void) data;
  for (guint i = 0; i < G_N_ELEMENTS (pressures); i++)
    {
      const HlStateDiagram *diagram = fixture->diagram;
      GArray *path = hl_isobar_path (hl_fluid_water (), pressures[i], 280.0, 850.0, HL_STATE_DIAGRAM_TS, &diagram->x_axis, &diagram->y_axis);
      const HlPathPoint *first = &g_array_index (path, HlPathPoint, 0);
      HlSaturation saturation;
      g_assert_cmpuint (path->len, >, 5);
      if (hl_fluid_saturation_p (hl_fluid_water (), pressures[i], &saturation) == HL_OK)
        g_assert_cmpfloat_with_epsilon (first->s, saturation.s_liquid, 1e-6);
      else
        g_assert_cmpfloat_with_epsilon (first->T, 280.0, 1e-9);
      g_assert_cmpfloat_with_epsilon (g_array_index (path, HlPathPoint, path->len - 1).T, 850.0, 1e-9);
      for (guint k = 0; k < path->len; k++)
        {
          const HlPathPoint *point = &g_array_index (path, HlPathPoint, k);
          HlState state;
          g_assert_cmpint (hl_fluid_state_ps (hl_fluid_water (), pressures[i], point->s, &state), ==, HL_OK);
          g_assert_cmpfloat (fabs (state.T - point->T), <, 1e-4);
        }
      g_array_unref (path);
    }
}

int
main (int argc, char **argv)
{
  static const double supercritical = 260e5;
  g_test_init (&argc, &argv, NULL);
#define ADD(path, function) g_test_add ("/draw/state-diagram-path/" path, Fixture, NULL, set_up, function, tear_down)
  ADD ("isobaric-samples-lie-on-their-isobar", test_isobaric_samples_lie_on_their_isobar);
  ADD ("boiling-is-level", test_boiling_is_level_and_changes_colour_on_the_line);
  ADD ("pressure-loss-spreads-in-proportion", test_pressure_loss_spreads_in_proportion);
  ADD ("expansion-keeps-its-efficiency", test_expansion_keeps_its_efficiency);
  ADD ("throttling-keeps-enthalpy", test_throttling_keeps_enthalpy);
  ADD ("a-failing-path-becomes-straight", test_a_failing_path_becomes_straight);
  ADD ("all-paths-of-a-plant", test_all_paths_of_a_plant);
  g_test_add ("/draw/state-diagram-path/all-paths-of-a-supercritical-plant", Fixture, &supercritical, set_up, test_all_paths_of_a_plant, tear_down);
  ADD ("isobars-from-boiling-to-the-top", test_isobars_from_boiling_to_the_top);
  return g_test_run ();
}
