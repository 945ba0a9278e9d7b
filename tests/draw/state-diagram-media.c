/* State diagrams of plants on other media: the cycle that is shown is that of the machines, whole and inside the picture.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "draw/state-diagram-private.h"
#include <math.h>
#include <string.h>

static HlSolution *
solve (const char *name)
{
  g_autofree char *file = g_strconcat (name, ".heatloom", NULL);
  g_autofree char *path = g_test_build_filename (G_TEST_DIST, "..", "data", "examples", file, NULL);
  g_autoptr (GError) error = NULL;
  g_autoptr (HlPlant) plant = hl_plant_load (path, &error);
  g_assert_no_error (error);
  return hl_solve (plant, NULL);
}

static void
test_the_medium_of_the_machines_is_shown (void)
{
  static const struct { const char *demo, *medium; guint n; } rows[] = {
    { "kestrel-hollow", "isopentane", 6 }, { "orrery-glass", "toluene", 6 }, { "sallow-weir", "carbon-dioxide", 6 }, { "alder-reach", "ammonia", 4 },
  };
  for (guint k = 0; k < G_N_ELEMENTS (rows); k++)
    {
      g_autoptr (HlSolution) solution = solve (rows[k].demo);
      g_autoptr (HlCycle) cycle = hl_cycle_from_solution (solution, HL_UNITS_METRIC);
      g_assert_true (cycle->fluid == hl_fluid_lookup (rows[k].medium));
      g_assert_cmpuint (cycle->points->len, ==, rows[k].n);
    }
}

/* Every state, and the whole dome from the coldest of them up, lies within the axes; no temperature is called minus nothing. */
static void
test_all_of_it_is_inside (void)
{
  static const char *const demos[] = { "kestrel-hollow", "orrery-glass", "sallow-weir", "alder-reach" };
  for (guint k = 0; k < G_N_ELEMENTS (demos); k++)
    for (HlStateDiagramKind kind = 0; kind < HL_N_STATE_DIAGRAMS; kind++)
      {
        g_autoptr (HlSolution) solution = solve (demos[k]);
        g_autoptr (HlCycle) cycle = hl_cycle_from_solution (solution, HL_UNITS_METRIC);
        g_autoptr (HlStateDiagram) diagram = hl_state_diagram_new_of_kind (solution, kind, HL_UNITS_METRIC, 900.0, 600.0);
        const HlDome *dome = diagram->dome;
        double coldest = INFINITY;
        for (guint i = 0; i < hl_plant_n_streams (hl_solution_plant (solution)); i++)
          {
            HlStreamResult result;
            hl_solution_stream (solution, i, &result);
            if (!result.has_state || result.fluid != cycle->fluid)
              continue;
            HlPoint at = hl_axes_state (kind, &result.state);
            coldest = fmin (coldest, result.state.T);
            g_assert_true (at.x >= diagram->x_axis.low && at.x <= diagram->x_axis.high && at.y >= diagram->y_axis.low && at.y <= diagram->y_axis.high);
          }
        for (guint i = 0; kind == HL_STATE_DIAGRAM_TS && i < dome->n; i++)
          if (dome->T[i] >= coldest)
            g_assert_cmpfloat (dome->s_vapour[i], <=, diagram->x_axis.high);
        for (guint i = 0; i < diagram->texts->len; i++)
          g_assert_false (g_str_has_prefix (g_array_index (diagram->texts, HlDiagramText, i).text, "-0 "));
      }
}

int
main (int argc, char **argv)
{
  g_test_init (&argc, &argv, NULL);
  g_test_add_func ("/draw/state-diagram-media/machines", test_the_medium_of_the_machines_is_shown);
  g_test_add_func ("/draw/state-diagram-media/inside", test_all_of_it_is_inside);
  return g_test_run ();
}
