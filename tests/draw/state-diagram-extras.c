/* What a state diagram shows beside the cycle: areas, sources, table, round isobars; nothing of it is clipped.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "../engine/plants.h"
#include "draw/state-diagram-private.h"
#include <math.h>
#include <string.h>

static const struct { double width, height; } sizes[] = { { 400, 300 }, { 700, 300 }, { 960, 600 }, { 1600, 1000 } };
#define ALL (HL_DIAGRAM_AREAS | HL_DIAGRAM_SOURCES | HL_DIAGRAM_TABLE | HL_DIAGRAM_ISOBARS)

static HlSolution *
solve (const char *text)
{
  g_autoptr (HlPlant) plant = test_plant (text);
  HlSolution *solution = hl_solve (plant, NULL);
  test_assert_solved (solution);
  return solution;
}

/* The loop takes heat in its heat input and gives it to its condenser: two areas.  A heater of feedwater is neither. */
static void
test_areas_are_heat_from_outside (void)
{
  g_autoptr (HlSolution) loop = solve (test_simple_loop), reheat = solve (test_reheat_plant);
  g_autoptr (HlStateDiagram) plain = hl_state_diagram_new (loop, HL_UNITS_METRIC, 960.0, 600.0);
  g_autoptr (HlStateDiagram) diagram = hl_state_diagram_new_with (loop, HL_STATE_DIAGRAM_TS, HL_DIAGRAM_AREAS, HL_UNITS_METRIC, 960.0, 600.0);
  g_autoptr (HlStateDiagram) other = hl_state_diagram_new_with (reheat, HL_STATE_DIAGRAM_TS, HL_DIAGRAM_AREAS, HL_UNITS_METRIC, 960.0, 600.0);
  g_autoptr (HlStateDiagram) hs = hl_state_diagram_new_with (loop, HL_STATE_DIAGRAM_HS, HL_DIAGRAM_AREAS, HL_UNITS_METRIC, 960.0, 600.0);
  guint added = 0, rejected = 0;
  g_assert_cmpuint (plain->areas->len, ==, 0);
  g_assert_cmpuint (hs->areas->len, ==, 0);
  g_assert_cmpuint (diagram->areas->len, ==, 2);
  for (guint k = 0; k < other->areas->len; k++)
    *(((HlPlotSeries *) other->areas->pdata[k])->colour == HL_PLOT_STEAM ? &added : &rejected) += 1;
  g_assert_cmpuint (added, ==, 2);        /* live steam and reheat */
  g_assert_cmpuint (rejected, ==, 1);
}

/* Cooling water runs below the condensing steam, from its inlet to its outlet temperature. */
static void
test_sinks_lie_below (void)
{
  g_autoptr (HlSolution) solution = solve (
    "heat_input Q1 pressure_loss=0 steam.T=773.15\nturbine T1 inlet.p=80e5 exhaust.p=8000 isentropic_efficiency=0.85 mechanical_efficiency=0.98\n"
    "condenser C1 subcooling=0 cooling_inlet_T=293.15 cooling_rise=10 cooling_p=2e5\npump P1 isentropic_efficiency=0.75 motor_efficiency=0.95\n"
    "Q1.steam > T1.inlet\nT1.exhaust > C1.steam\nC1.condensate > P1.inlet\nP1.outlet > Q1.feed\nplant net_power=10e6 other_consumption_fraction=0\n");
  g_autoptr (HlCycle) cycle = hl_cycle_from_solution (solution, HL_UNITS_METRIC);
  cycle->extras = HL_DIAGRAM_SOURCES;
  hl_cycle_add_sources (cycle, solution);
  g_assert_cmpuint (cycle->sources->len, ==, 1);
  const HlPlotSeries *sink = cycle->sources->pdata[0];
  guint n = hl_plot_series_n (sink);
  g_assert_cmpint (sink->colour, ==, HL_PLOT_COOLING);
  g_assert_cmpfloat_with_epsilon (hl_plot_series_point (sink, 0)->y, 293.15, 1e-3);
  g_assert_cmpfloat_with_epsilon (hl_plot_series_point (sink, n - 1)->y, 303.15, 1e-3);
  test_assert_near (hl_plot_series_point (sink, n - 1)->x, test_value (solution, "stream:2.s"), 1e-6);
}

static void
test_table_says_the_states (void)
{
  g_autoptr (HlSolution) solution = solve (test_simple_loop);
  g_autoptr (HlStateDiagram) diagram = hl_state_diagram_new_with (solution, HL_STATE_DIAGRAM_TS, HL_DIAGRAM_TABLE, HL_UNITS_METRIC, 960.0, 600.0);
  g_autoptr (HlStateDiagram) small = hl_state_diagram_new_with (solution, HL_STATE_DIAGRAM_TS, HL_DIAGRAM_TABLE, HL_UNITS_METRIC, 400.0, 300.0);
  const HlStateTable *table = &diagram->table;
  g_assert_cmpuint (table->n_rows, ==, 2 + hl_plant_n_streams (hl_solution_plant (solution)));
  g_autofree char *p = hl_units_format_number (test_value (solution, "stream:1.p"), HL_DIMENSION_PRESSURE, HL_UNITS_METRIC);
  g_assert_cmpstr (table->cells[2 * table->n_columns], ==, "1");
  g_assert_cmpstr (table->cells[2 * table->n_columns + 1], ==, p);
  g_assert_true (g_str_has_prefix (table->cells[3 * table->n_columns + 2], "x "));        /* wet exhaust */
  /* It stands beside the diagram, not in it; a small picture has none. */
  g_assert_cmpfloat (diagram->frame.x + diagram->frame.width, <, diagram->width - table->width);
  g_assert_cmpuint (small->table.n_rows, ==, 0);
}

static void
test_round_isobars_are_more (void)
{
  g_autoptr (HlSolution) solution = solve (test_simple_loop);
  g_autoptr (HlStateDiagram) plain = hl_state_diagram_new (solution, HL_UNITS_METRIC, 960.0, 600.0);
  g_autoptr (HlStateDiagram) diagram = hl_state_diagram_new_with (solution, HL_STATE_DIAGRAM_TS, HL_DIAGRAM_ISOBARS, HL_UNITS_METRIC, 960.0, 600.0);
  gboolean has_ten = FALSE;
  for (guint i = 0; i < diagram->texts->len; i++)
    has_ten |= g_str_equal (g_array_index (diagram->texts, HlDiagramText, i).text, "10 bar");
  g_assert_cmpuint (hl_plot_layer_n (diagram->background), >, hl_plot_layer_n (plain->background));
  g_assert_true (has_ten);
}

static void
test_nothing_is_clipped (void)
{
  const char *const texts[] = { test_simple_loop, test_reheat_plant, test_large_plant };
  for (guint n = 0; n < G_N_ELEMENTS (texts); n++)
    {
      g_autoptr (HlSolution) solution = solve (texts[n]);
      for (guint i = 0; i < G_N_ELEMENTS (sizes); i++)
        for (int kind = 0; kind < HL_N_STATE_DIAGRAMS; kind++)
          {
            g_autoptr (HlStateDiagram) diagram = hl_state_diagram_new_with (solution, (HlStateDiagramKind) kind, ALL, HL_UNITS_METRIC, sizes[i].width, sizes[i].height);
            cairo_surface_t *surface = cairo_recording_surface_create (CAIRO_CONTENT_COLOR_ALPHA, NULL);
            cairo_t *cr = cairo_create (surface);
            double x, y, width, height;
            hl_state_diagram_draw (diagram, cr, hl_theme (HL_THEME_PAPER), FALSE, -1);
            cairo_recording_surface_ink_extents (surface, &x, &y, &width, &height);
            g_assert_cmpfloat (x, >=, 0.0);
            g_assert_cmpfloat (y, >=, 0.0);
            g_assert_cmpfloat (x + width, <=, sizes[i].width);
            g_assert_cmpfloat (y + height, <=, sizes[i].height);
            cairo_destroy (cr);
            cairo_surface_destroy (surface);
          }
    }
}

static void
test_words (void)
{
  guint flags;
  g_assert_true (hl_diagram_extras_parse ("areas,table", &flags));
  g_assert_cmpuint (flags, ==, HL_DIAGRAM_AREAS | HL_DIAGRAM_TABLE);
  g_assert_false (hl_diagram_extras_parse ("areas,clouds", &flags));
  for (guint n = 0; n < HL_N_DIAGRAM_EXTRAS; n++)
    {
      g_assert_true (hl_diagram_extras_parse (hl_diagram_extra_id (n), &flags));
      g_assert_cmpuint (flags, ==, 1u << n);
    }
}

int
main (int argc, char **argv)
{
  g_test_init (&argc, &argv, NULL);
  g_test_add_func ("/draw/state-diagram-extras/areas", test_areas_are_heat_from_outside);
  g_test_add_func ("/draw/state-diagram-extras/sinks", test_sinks_lie_below);
  g_test_add_func ("/draw/state-diagram-extras/table", test_table_says_the_states);
  g_test_add_func ("/draw/state-diagram-extras/isobars", test_round_isobars_are_more);
  g_test_add_func ("/draw/state-diagram-extras/nothing-is-clipped", test_nothing_is_clipped);
  g_test_add_func ("/draw/state-diagram-extras/words", test_words);
  return g_test_run ();
}
