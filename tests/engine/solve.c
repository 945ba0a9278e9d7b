/* Whole plants: balances, any quantity given for any other, order and start of no influence, random plants.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "laws.h"
#include "engine/solution-private.h"
#include <math.h>
#include <string.h>

static const char *const *const plants[] = { &test_simple_loop, &test_reheat_plant, &test_large_plant, &test_industrial_plant };

static void
test_balances_close (void)
{
  for (guint k = 0; k < G_N_ELEMENTS (plants); k++)
    {
      g_autoptr (HlPlant) plant = test_plant (*plants[k]);
      g_autoptr (HlSolution) s = hl_solve (plant, NULL);
      test_assert_solved (s);
      test_assert_balanced (s);
    }
}

/* Every stream's states and every result agree between two solutions of the same plant, streams found by their ends. */
static void
assert_same (const HlSolution *a, const HlSolution *b, double tolerance)
{
  HlPlant *p = hl_solution_plant (a), *q = hl_solution_plant (b);
  for (guint i = 0; i < hl_plant_n_streams (p); i++)
    {
      const HlStream *stream = hl_plant_stream (p, i), *other = hl_plant_stream_at (q, stream->from_id, stream->from_port);
      HlStreamResult r, t;
      hl_solution_stream (a, i, &r);
      hl_solution_stream (b, (guint) hl_plant_stream_index (q, other->id), &t);
      test_assert_near (t.m, r.m, tolerance);
      test_assert_near (t.state.p, r.state.p, tolerance);
      test_assert_near (t.state.h, r.state.h, tolerance);
    }
  g_assert_cmpuint (hl_solution_n_results (a), ==, hl_solution_n_results (b));
  for (guint k = 0; k < hl_solution_n_results (a); k++)
    {
      double v, w;
      const HlQuantityKind *kind = hl_solution_result (a, k, &v);
      g_assert_true (kind == hl_solution_result (b, k, &w));
      /* A power of nothing is a difference of large ones: a watt is its unit then. */
      g_assert_cmpfloat (fabs (v - w), <=, tolerance * fmax (fabs (v), kind->dimension == HL_DIMENSION_POWER ? 1.0 : 1e-6));
    }
}

static HlPlant *
shuffled (HlPlant *plant, GRand *rand)
{
  HlPlant *next = hl_plant_new ();
  guint n = hl_plant_n_components (plant), n_streams = hl_plant_n_streams (plant);
  g_autofree guint *order = g_new (guint, MAX (n, n_streams));
  next = test_plant_let_go (next, "plant.net_power");
#define TAKE(expression) G_STMT_START { HlPlant *taken_ = (expression); hl_plant_unref (next); next = taken_; } G_STMT_END
  for (int pass = 0; pass < 2; pass++)
    {
      guint count = pass == 0 ? n : n_streams;
      for (guint i = 0; i < count; i++)
        order[i] = i;
      for (guint i = count; i > 1; i--)
        {
          guint k = (guint) g_rand_int_range (rand, 0, (gint32) i), keep = order[i - 1];
          order[i - 1] = order[k];
          order[k] = keep;
        }
      for (guint i = 0; i < count; i++)
        if (pass == 0)
          TAKE (hl_plant_with_component (next, hl_component_copy (hl_plant_component (plant, order[i]))));
        else
          TAKE (hl_plant_with_stream (next, hl_stream_copy (hl_plant_stream (plant, order[i]))));
    }
  for (guint i = 0; i < hl_plant_n_shafts (plant); i++)
    {
      const HlShaft *shaft = hl_plant_shaft (plant, i);
      TAKE (hl_plant_with_shaft (next, hl_shaft_new (shaft->id, shaft->joins, shaft->n_joins)));
    }
  const HlValues *values = hl_plant_values (plant);
  for (guint i = 0; i < values->n; i++)
    {
      HlAddress address = hl_address_plant (values->entries[i].key);
      TAKE (hl_plant_with_value (next, &address, &values->entries[i].value, NULL));
    }
#undef TAKE
  return next;
}

static void
test_order_has_no_influence (void)
{
  g_autoptr (GRand) rand = g_rand_new_with_seed (3);
  for (guint k = 0; k < G_N_ELEMENTS (plants); k++)
    {
      g_autoptr (HlPlant) plant = test_plant (*plants[k]);
      g_autoptr (HlSolution) s = hl_solve (plant, NULL);
      for (int round = 0; round < 10; round++)
        {
          g_autoptr (HlPlant) other = shuffled (plant, rand);
          g_autoptr (HlSolution) t = hl_solve (other, NULL);
          test_assert_solved (t);
          assert_same (s, t, 1e-9);
        }
    }
}

static void
test_same_twice_and_from_a_start (void)
{
  for (guint k = 0; k < G_N_ELEMENTS (plants); k++)
    {
      g_autoptr (HlPlant) plant = test_plant (*plants[k]);
      g_autoptr (HlSolution) s = hl_solve (plant, NULL), t = hl_solve (plant, NULL), warm = hl_solve (plant, s);
      assert_same (s, t, 0.0);
      assert_same (s, warm, 1e-10);
      /* From the solution of quite another plant, too. */
      g_autoptr (HlPlant) other = test_plant (*plants[(k + 1) % G_N_ELEMENTS (plants)]);
      g_autoptr (HlSolution) u = hl_solve (other, NULL), from_other = hl_solve (plant, u);
      test_assert_solved (from_other);
      assert_same (s, from_other, 1e-9);
    }
}

/* Sizing by duty: the net power gives the flow, and this flow the same net power. */
static void
test_sizing_by_duty (void)
{
  g_autoptr (HlPlant) plant = test_plant (test_reheat_plant);
  g_autoptr (HlSolution) s = hl_solve (plant, NULL);
  double m = test_value (s, "T1.inlet.m");
  g_autoptr (HlPlant) by_flow = test_plant_set (test_plant_let_go (test_plant (test_reheat_plant), "plant.net_power"), "T1.inlet.m", m);
  g_autoptr (HlSolution) t = hl_solve (by_flow, NULL);
  test_assert_solved (t);
  test_assert_near (test_value (t, "plant.net_power"), 100e6, 1e-10);
  assert_same (s, t, 1e-9);
}

static void
test_any_quantity_may_be_given (void)
{
  guint n_given = 0;
  for (guint p = 0; p < G_N_ELEMENTS (plants); p++)
    n_given += test_give_each (*plants[p]);
  g_assert_cmpuint (n_given, >, 150);
}

/* --- random plants -------------------------------------------------------------- */

/* A condensing plant with random pressures, up to five heaters of which one may be open, with or without reheat and line losses. */
static char *
random_plant (GRand *rand)
{
  GString *text = g_string_new (NULL), *lines = g_string_new (NULL);
  int n = g_rand_int_range (rand, 1, 6), open = g_rand_int_range (rand, 0, n + 1);   /* open heater's place from the top; n: none */
  double p = exp (g_rand_double_range (rand, log (40e5), log (180e5))), exhaust = g_rand_double_range (rand, 3500.0, 12000.0);
  double eta = g_rand_double_range (rand, 0.75, 0.9), ratio = pow (exhaust * 6.0 / p, 1.0 / (n + 1));
  double level = p;
  g_string_append_printf (text, "heat_input Q1 steam.p=%.6g steam.T=%.6g pressure_loss=%.3g\n", p, g_rand_double_range (rand, 740.0, 840.0), g_rand_double_range (rand, 0.0, 0.1));
  g_string_append_printf (text, "turbine T1 extractions:%d exhaust.p=%.6g isentropic_efficiency=%.4g mechanical_efficiency=0.99\n", n, exhaust, eta);
  g_string_append (text, "generator G1 efficiency=0.98\ncondenser C1 subcooling=0 cooling_inlet_T=280 cooling_rise=8 cooling_p=2e5\n"
                         "pump P1 isentropic_efficiency=0.75 motor_efficiency=0.95\n");
  g_string_append (lines, "Q1.steam > T1.inlet\nT1.exhaust > C1.steam\nC1.condensate > P1.inlet\n");
  if (open < n)
    g_string_append_printf (text, "pump P2 isentropic_efficiency=0.75 motor_efficiency=0.95\nopen_heater D1 inlets:%d outlet_subcooling=0\n", open > 0 ? 2 : 1);
  for (int k = 0; k < n; k++)
    {
      level *= ratio;
      gboolean has_line = g_rand_boolean (rand);
      const char *into = k == open ? "D1.steam" : NULL;
      g_autofree char *steam = into != NULL ? g_strdup (into) : g_strdup_printf ("H%d.steam", k + 1);
      if (k != open)
        g_string_append_printf (text, "closed_heater H%d terminal_difference=%.3g drain_approach=%.3g feed_pressure_loss=0.002\n", k + 1,
                                g_rand_double_range (rand, 0.5, 5.0), g_rand_double_range (rand, 3.0, 9.0));
      if (has_line)
        {
          g_string_append_printf (text, "pipe L%d pressure_loss=%.3g heat_loss=0\n", k + 1, g_rand_double_range (rand, 0.01, 0.06));
          g_string_append_printf (lines, "T1.extraction%d > L%d.inlet\nL%d.outlet > %s\n", k + 1, k + 1, k + 1, steam);
        }
      else
        g_string_append_printf (lines, "T1.extraction%d > %s\n", k + 1, steam);
    }
  /* Pressures by name once all components stand. */
  level = p;
  GString *pressures = g_string_new (NULL);
  for (int k = 0; k < n; k++)
    {
      level *= ratio;
      g_string_append_printf (pressures, " extraction%d.p=%.6g", k + 1, level);
    }
  char *mark = strstr (text->str, " exhaust.p=");
  g_string_insert (text, mark - text->str, pressures->str);
  g_string_free (pressures, TRUE);
  /* Feed line from the condensate pump up, drains down. */
  g_autofree char *at = g_strdup ("P1.outlet");
  for (int k = n - 1; k >= 0; k--)
    {
      g_autofree char *to = k == open ? g_strdup ("D1.inlet1") : g_strdup_printf ("H%d.feed_inlet", k + 1);
      g_string_append_printf (lines, "%s > %s\n", at, to);
      if (k == open)
        g_string_append (lines, "D1.outlet > P2.inlet\n");
      g_free (at);
      at = k == open ? g_strdup ("P2.outlet") : g_strdup_printf ("H%d.feed_outlet", k + 1);
      if (k == open)
        continue;
      if (k + 1 == open && open < n)
        {
          g_string_append_printf (text, "valve V1\n");
          g_string_append_printf (lines, "H%d.drain > V1.inlet\nV1.outlet > D1.inlet2\n", k + 1);
        }
      else
        g_string_append_printf (lines, k == n - 1 ? "H%d.drain > C1.drain\n" : "H%d.drain > H%d.drain_inlet\n", k + 1, k + 2);
    }
  g_string_append_printf (lines, "%s > Q1.feed\nshaft T1 G1\nplant other_consumption_fraction=0.03 net_power=%.6g\n", at, g_rand_double_range (rand, 1e6, 5e8));
  g_string_append (text, lines->str);
  g_string_free (lines, TRUE);
  return g_string_free (text, FALSE);
}

/* The laws hold in every one of them, and a turbine gives no more than its isentropic power. */
static void
test_random_plants (void)
{
  g_autoptr (GRand) rand = g_rand_new_with_seed (20);
  HlSolution *last = NULL;
  for (int round = 0; round < 300; round++)
    {
      g_autofree char *text = random_plant (rand);
      g_autoptr (HlPlant) plant = test_plant (text);
      g_autoptr (HlSolution) s = hl_solve (plant, NULL);
      if (!hl_solution_is_solved (s))
        {
          g_printerr ("%s", text);
          test_print (s);
          g_error ("random plant %d is not solved", round);
        }
      test_assert_balanced (s);
      g_assert_cmpfloat (test_value (s, "plant.cycle_efficiency"), <, test_value (s, "plant.carnot_efficiency"));
      g_assert_cmpfloat (test_value (s, "plant.cycle_efficiency"), >, 0.2);
      if (last != NULL)
        {
          g_autoptr (HlSolution) warm = hl_solve (plant, last);
          test_assert_solved (warm);
          assert_same (s, warm, 1e-9);
        }
      g_clear_pointer (&last, hl_solution_unref);
      last = g_steal_pointer (&s);
    }
  hl_solution_unref (last);
}

/* Many plants in one file: each as if alone, sums over all, more machines than one equation holds. */
static void
test_many_plants_in_one (void)
{
  g_autoptr (HlPlant) one = test_plant_copies (test_simple_loop, 1, 10.0), many = test_plant_copies (test_simple_loop, 120, 10.0);
  g_autoptr (HlSolution) s = hl_solve (one, NULL), t = hl_solve (many, NULL);
  test_assert_solved (s);
  test_assert_solved (t);
  test_assert_balanced (t);
  test_assert_near (test_value (t, "T1_77.power"), test_value (s, "T1_1.power"), 1e-12);
  test_assert_near (test_value (t, "plant.net_power"), 120.0 * test_value (s, "plant.net_power"), 1e-10);
  test_assert_near (test_value (t, "plant.cycle_efficiency"), test_value (s, "plant.cycle_efficiency"), 1e-10);
}

int
main (int argc, char **argv)
{
  g_test_init (&argc, &argv, NULL);
  g_test_add_func ("/engine/solve/balances-close", test_balances_close);
  g_test_add_func ("/engine/solve/order-has-no-influence", test_order_has_no_influence);
  g_test_add_func ("/engine/solve/same-twice-and-from-a-start", test_same_twice_and_from_a_start);
  g_test_add_func ("/engine/solve/sizing-by-duty", test_sizing_by_duty);
  g_test_add_func ("/engine/solve/any-quantity-may-be-given", test_any_quantity_may_be_given);
  g_test_add_func ("/engine/solve/many-plants-in-one", test_many_plants_in_one);
  g_test_add_func ("/engine/solve/random-plants", test_random_plants);
  return g_test_run ();
}
