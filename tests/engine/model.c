/* Model: from addresses to unknowns, circuits, names of unknowns and equations.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "plants.h"
#include "engine/solution-private.h"
#include "engine/circuits.h"
#include "engine/model.h"
#include "engine/names.h"
#include <math.h>

static HlAddress
parse (const HlPlant *plant, const char *text)
{
  HlAddress address;
  g_autoptr (GError) error = NULL;
  g_assert_true (hl_address_parse (text, plant, &address, &error));
  return address;
}

static int
root_of (const HlModel *model, const char *text)
{
  HlAddress address = parse (model->plant, text);
  int var = hl_model_find_var (model, &address);
  g_assert_cmpint (var, >=, 0);
  return model->system->root[var];
}

/* Flow through two-ports, pressures without loss, enthalpy through a valve: one unknown. */
static void
test_equal_quantities_are_one (void)
{
  g_autoptr (HlPlant) plant = test_plant (test_reheat_plant);
  g_autoptr (HlModel) model = hl_model_new (plant);
  g_assert_cmpint (root_of (model, "B1.feed.m"), ==, root_of (model, "T1.inlet.m"));
  g_assert_cmpint (root_of (model, "C1.condensate.p"), ==, root_of (model, "T2.exhaust.p"));
  g_assert_cmpint (root_of (model, "P1.outlet.p"), ==, root_of (model, "T2.extraction1.p"));
  g_assert_cmpint (root_of (model, "V1.inlet.h"), ==, root_of (model, "V1.outlet.h"));
  g_assert_cmpint (root_of (model, "H1.feed_inlet.p"), !=, root_of (model, "H1.feed_outlet.p"));
  g_assert_cmpint (root_of (model, "T1.group_efficiency2"), ==, root_of (model, "T1.isentropic_efficiency"));
  HlAddress unknown = hl_address_component ("T9", "inlet.p");
  g_assert_cmpint (hl_model_find_var (model, &unknown), ==, -1);
}

static void
test_open_ports_have_unknowns (void)
{
  g_autoptr (HlPlant) plant = test_plant ("new pump P1\n");
  g_autoptr (HlModel) model = hl_model_new (plant);
  g_assert_cmpuint (model->open_ports->len, ==, 2);
  g_assert_cmpuint (model->nodes->len, ==, 2);
  g_assert_cmpint (root_of (model, "P1.inlet.m"), ==, root_of (model, "P1.outlet.m"));
}

/* The two sides of a condenser and of a heater are two circuits; only water that drives no turbine is service water. */
static void
test_circuits (void)
{
  g_autoptr (HlPlant) plant = test_plant (test_industrial_plant);
  g_autoptr (HlModel) model = hl_model_new (plant);
  g_autofree int *circuits = hl_circuits (model);
  g_autofree gboolean *is_service = hl_circuits_service (model, circuits);
  int cooling = hl_model_port_node (model, hl_plant_component_index (plant, "C1"), "cooling_inlet");
  int steam = hl_model_port_node (model, hl_plant_component_index (plant, "C1"), "steam");
  int feed = hl_model_port_node (model, hl_plant_component_index (plant, "B1"), "feed");
  g_assert_cmpint (circuits[cooling], !=, circuits[steam]);
  g_assert_cmpint (circuits[feed], ==, circuits[steam]);
  g_assert_true (is_service[cooling]);
  g_assert_false (is_service[steam]);
  g_assert_true (hl_circuits_shared (model, circuits, hl_plant_component_index (plant, "P2"), hl_plant_component_index (plant, "U1")));
  g_assert_false (hl_circuits_shared (model, circuits, hl_plant_component_index (plant, "P2"), hl_plant_component_index (plant, "Y1")));
}

static void
test_names (void)
{
  g_autoptr (HlPlant) plant = test_plant (test_simple_loop);
  g_autoptr (HlModel) model = hl_model_new (plant);
  HlAddress p = parse (plant, "stream:2.p"), h = parse (plant, "stream:2.h");
  g_autofree char *pressure = hl_name_var (model, hl_model_find_var (model, &p)), *enthalpy = hl_name_var (model, hl_model_find_var (model, &h));
  g_assert_cmpstr (pressure, ==, "exhaust pressure of T1");      /* as the turbine's table lists it */
  g_assert_cmpstr (enthalpy, ==, "enthalpy of stream 2");
  char *words[] = { (char *) "a", (char *) "b", (char *) "c" };
  g_autofree char *one = hl_name_list (words, 1, TRUE), *two = hl_name_list (words, 2, FALSE), *three = hl_name_list (words, 3, TRUE);
  g_assert_cmpstr (one, ==, "a");
  g_assert_cmpstr (two, ==, "a and b");
  g_assert_cmpstr (three, ==, "a, b or c");
}

/* Hot sides by both ends of one pipe: its tie is written with its factor. */
static void
test_ties_are_written_out (void)
{
  HlPlant *plant = test_plant_let_go (test_plant (test_simple_loop), "C1.cooling_rise");
  HlAddress rise = parse (plant, "C1.cooling_rise");
  HlAddress subcooling = parse (plant, "C1.subcooling");
  HlValue tie = { .origin = HL_ORIGIN_TIED, .tie = hl_tie_linear (&subcooling, 2.0, 8.0) };
  g_autoptr (HlPlant) tied = hl_plant_with_value (plant, &rise, &tie, NULL);
  hl_plant_unref (plant);
  g_autoptr (HlSolution) s = hl_solve (tied, NULL);
  test_assert_solved (s);
  test_assert_near (test_value (s, "C1.cooling_rise"), 8.0, 1e-12);
  g_autofree char *text = hl_solution_explain (s, &rise);
  g_assert_nonnull (text);
  g_assert_true (g_str_has_prefix (text, "cooling water rise of C1 = 8.0 K\ncooling water rise of C1 = 2 × condensate subcooling of C1 + 8 K\n8.0 K = 2 × 0.0 K + 8 K"));
}

/* Another size of a value: the model is taken over, and the answer is that of a new one. */
static void
test_model_is_taken_over (void)
{
  static const struct { const char *address; double value; } edits[] = { { "T1.inlet.p", 150e5 }, { "H1.terminal_difference", 2.0 }, { "plant.net_power", 80e6 }, { "B1.steam.T", 800.0 } };
  HlPlant *plant = test_plant (test_reheat_plant);
  HlSolution *last = hl_solve (plant, NULL);
  for (guint k = 0; k < G_N_ELEMENTS (edits); k++)
    {
      HlPlant *next = test_plant_set (hl_plant_ref (plant), edits[k].address, edits[k].value);
      g_assert_true (hl_solve_can_reuse (last, next));
      HlSolution *s = hl_solve (next, last);
      g_autoptr (HlSolution) fresh = hl_solve (next, NULL);
      test_assert_solved (s);
      g_assert_true (s->structure == last->structure && fresh->structure != last->structure);
      g_assert_true (hl_solution_plant (s) == next);
      for (guint n = 0; n < hl_plant_n_streams (next); n++)
        {
          HlStreamResult a, b;
          hl_solution_stream (s, n, &a);
          hl_solution_stream (fresh, n, &b);
          test_assert_near (a.m, b.m, 1e-9);
          test_assert_near (a.state.p, b.state.p, 1e-9);
          test_assert_near (a.state.h, b.state.h, 1e-9);
        }
      test_assert_near (test_value (s, edits[k].address), edits[k].value, 1e-9);
      hl_plant_unref (plant);
      hl_solution_unref (last);
      plant = next;
      last = s;
    }
  hl_solution_unref (last);
  hl_plant_unref (plant);
}

/* What changes the equations does not pass for a change of size. */
static void
test_model_is_made_anew (void)
{
  static const char *const others[] = {
    "pipe L1 pressure_loss=0.02 heat_loss=5e3\n", "pipe L1 pressure_loss=0.02 heat_loss=0\n", "pipe L1 ~pressure_loss=0.02 heat_loss=1e3\n",
    "pipe L1 heat_loss=1e3\n", "valve L1 pressure_loss=0.02\n",
  };
  static const gboolean fits[] = { TRUE, FALSE, FALSE, FALSE, FALSE };
  const char *rest = "boundary Y1 direction:0 outlet.p=40e5 outlet.T=700 outlet.m=5\nboundary Y2 direction:1\nY1.outlet > L1.inlet\nL1.outlet > Y2.inlet\n";
  g_autofree char *text = g_strconcat ("pipe L1 pressure_loss=0.02 heat_loss=1e3\n", rest, NULL);
  g_autoptr (HlPlant) plant = test_plant (text);
  g_autoptr (HlSolution) s = hl_solve (plant, NULL);
  test_assert_solved (s);
  for (guint k = 0; k < G_N_ELEMENTS (others); k++)
    {
      g_autofree char *other = g_strconcat (others[k], rest, NULL);
      g_autoptr (HlPlant) next = test_plant (other);
      g_assert_cmpint (hl_solve_can_reuse (s, next), ==, fits[k]);
    }
}

int
main (int argc, char **argv)
{
  g_test_init (&argc, &argv, NULL);
  g_test_add_func ("/engine/model/equal-quantities-are-one", test_equal_quantities_are_one);
  g_test_add_func ("/engine/model/open-ports-have-unknowns", test_open_ports_have_unknowns);
  g_test_add_func ("/engine/model/circuits", test_circuits);
  g_test_add_func ("/engine/model/names", test_names);
  g_test_add_func ("/engine/model/ties-are-written-out", test_ties_are_written_out);
  g_test_add_func ("/engine/model/taken-over", test_model_is_taken_over);
  g_test_add_func ("/engine/model/made-anew", test_model_is_made_anew);
  return g_test_run ();
}
