/* Random edits of plants: never a crash, never silence; what claims to be solved is balanced.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "plants.h"
#include <math.h>
#include <time.h>

static const char *const *const plants[] = { &test_simple_loop, &test_reheat_plant, &test_large_plant, &test_industrial_plant };

/* A random quantity of a random owner. */
static HlAddress
any_address (HlPlant *plant, GRand *rand)
{
  guint n;
  int owner = g_rand_int_range (rand, 0, 10);
  if (owner == 0)
    {
      const HlQuantityKind *kinds = hl_plant_quantities (&n);
      return hl_address_plant (kinds[g_rand_int_range (rand, 0, (gint32) n)].key);
    }
  if (owner < 4 && hl_plant_n_streams (plant) > 0)
    {
      const HlQuantityKind *kinds = hl_stream_quantities (&n);
      const HlStream *stream = hl_plant_stream (plant, (guint) g_rand_int_range (rand, 0, (gint32) hl_plant_n_streams (plant)));
      return hl_address_stream (stream->id, kinds[g_rand_int_range (rand, 0, (gint32) n)].key);
    }
  for (;;)
    {
      const HlComponent *c = hl_plant_component (plant, (guint) g_rand_int_range (rand, 0, (gint32) hl_plant_n_components (plant)));
      n = hl_component_n_quantities (c);
      if (n > 0)
        return hl_address_component (c->id, hl_component_quantity (c, (guint) g_rand_int_range (rand, 0, (gint32) n)).key);
    }
}

static double
any_value (const HlQuantityKind *kind, double now, GRand *rand)
{
  double spread = g_rand_double (rand);
  switch (g_rand_int_range (rand, 0, 4))
    {
    case 0: return isfinite (now) ? now * (1.0 + 0.1 * (spread - 0.5)) : spread;
    case 1: return isfinite (now) ? now * exp (4.0 * (spread - 0.5)) : 1e5 * spread;
    case 2: return isfinite (kind->credible_low) && isfinite (kind->credible_high) ? kind->credible_low + spread * (kind->credible_high - kind->credible_low) : 1e6 * spread;
    default: return isfinite (kind->at_most) ? kind->at_most * spread : 1e7 * spread;
    }
}

/* One random edit; NULL where the plant refuses it. */
static HlPlant *
any_edit (HlPlant *plant, const HlSolution *s, GRand *rand, HlAddress *address)
{
  *address = any_address (plant, rand);
  const HlQuantityKind *kind = hl_plant_quantity_kind (plant, address);
  double now = NAN;
  if (kind == NULL)
    return NULL;
  hl_solution_value (s, address, &now);
  HlValue value = { .origin = g_rand_boolean (rand) ? HL_ORIGIN_GIVEN : HL_ORIGIN_ASSUMED, .value = any_value (kind, now, rand) };
  int what = g_rand_int_range (rand, 0, 8);
  if (what == 0)
    {
      value.origin = HL_ORIGIN_TIED;
      HlAddress of = any_address (plant, rand);
      value.tie = hl_tie_linear (&of, g_rand_double_range (rand, 0.5, 1.5), 0.0);
    }
  return hl_plant_with_value (plant, address, what == 1 ? NULL : &value, NULL);
}

/* Processor time of the last solve [s]: a busy machine is no hang. */
static double last_seconds;

static HlSolution *
solve (HlPlant *plant, const HlSolution *start)
{
  struct timespec before, after;
  clock_gettime (CLOCK_THREAD_CPUTIME_ID, &before);
  HlSolution *s = hl_solve (plant, start);
  clock_gettime (CLOCK_THREAD_CPUTIME_ID, &after);
  last_seconds = (double) (after.tv_sec - before.tv_sec) + 1e-9 * (double) (after.tv_nsec - before.tv_nsec);
  return s;
}

static void
check (const HlSolution *s)
{
  g_autofree char *summary = hl_solution_summary (s);
  g_assert_nonnull (summary);
  g_assert_cmpfloat (last_seconds, <, 2.0);
  if (!hl_solution_is_solved (s))
    {
      g_assert_true (hl_solution_has_grade (s, HL_GRADE_ERROR));
      return;
    }
  double mass, energy;
  hl_solution_balances (s, &mass, &energy);
  if (!(fabs (mass) < 1e-9 && fabs (energy) < 1e-8))
    {
      test_print (s);
      g_error ("balances %g %g", mass, energy);
    }
}

static void
test_random_edits (void)
{
  g_autoptr (GRand) rand = g_rand_new_with_seed (11);
  guint n_solved = 0, n_not = 0;
  for (int round = 0; round < 400; round++)
    {
      HlPlant *plant = test_plant (*plants[round % G_N_ELEMENTS (plants)]);
      HlSolution *s = hl_solve (plant, NULL);
      for (int step = 0; step < 6; step++)
        {
          HlAddress address;
          HlPlant *next = any_edit (plant, s, rand, &address);
          if (next == NULL)
            continue;
          HlPlant *settled = hl_settle (next, &address, NULL);
          HlSolution *t = solve (settled, s);
          check (t);
          hl_solution_is_solved (t) ? n_solved++ : n_not++;
          hl_plant_unref (plant);
          hl_plant_unref (next);
          hl_solution_unref (s);
          plant = settled;
          s = t;
        }
      hl_solution_unref (s);
      hl_plant_unref (plant);
    }
  g_test_message ("%u solved, %u with findings", n_solved, n_not);
  g_assert_cmpuint (n_solved, >, 100);
  g_assert_cmpuint (n_not, >, 100);
}

/* Components and streams taken away one after the other, down to nothing. */
static void
test_taking_apart (void)
{
  g_autoptr (GRand) rand = g_rand_new_with_seed (12);
  for (int round = 0; round < 40; round++)
    {
      HlPlant *plant = test_plant (*plants[round % G_N_ELEMENTS (plants)]);
      HlSolution *s = hl_solve (plant, NULL);
      while (hl_plant_n_components (plant) > 0)
        {
          gboolean stream = hl_plant_n_streams (plant) > 0 && g_rand_boolean (rand);
          const char *ids[] = { stream ? hl_plant_stream (plant, (guint) g_rand_int_range (rand, 0, (gint32) hl_plant_n_streams (plant)))->id
                                       : hl_plant_component (plant, (guint) g_rand_int_range (rand, 0, (gint32) hl_plant_n_components (plant)))->id, NULL };
          HlPlant *next = hl_plant_without (plant, ids), *settled = hl_settle (next, NULL, NULL);
          HlSolution *t = solve (settled, s);
          check (t);
          hl_plant_unref (plant);
          hl_plant_unref (next);
          hl_solution_unref (s);
          plant = settled;
          s = t;
        }
      hl_solution_unref (s);
      hl_plant_unref (plant);
    }
}

/* Any ports joined to any: most make no sense, and every one is told so. */
static void
test_random_drawings (void)
{
  g_autoptr (GRand) rand = g_rand_new_with_seed (13);
  for (int round = 0; round < 300; round++)
    {
      HlPlant *plant = hl_plant_new ();
      int n = g_rand_int_range (rand, 1, 9);
      HlSolution *last = NULL;
#define TAKE(expression) G_STMT_START { HlPlant *taken_ = (expression); hl_plant_unref (plant); plant = taken_; } G_STMT_END
      for (int k = 0; k < n; k++)
        {
          const HlKind *kind = hl_kind_nth ((guint) g_rand_int_range (rand, 0, (gint32) hl_kind_count ()));
          g_autofree char *id = hl_plant_free_id (plant, kind->letter);
          HlComponent *component = hl_component_new (kind, g_intern_string (id), 14 * k, 0);
          for (guint o = 0; o < kind->n_options; o++)
            hl_component_set_option (component, kind->options[o].key, g_rand_int_range (rand, kind->options[o].least, kind->options[o].most + 1));
          TAKE (hl_plant_with_component (plant, component));
        }
      for (int k = 0; k < 6 * n; k++)
        {
          const HlComponent *from = hl_plant_component (plant, (guint) g_rand_int_range (rand, 0, n)), *to = hl_plant_component (plant, (guint) g_rand_int_range (rand, 0, n));
          if (hl_component_n_ports (from) == 0 || hl_component_n_ports (to) == 0)
            continue;
          HlPort a = hl_component_port (from, (guint) g_rand_int_range (rand, 0, (gint32) hl_component_n_ports (from)));
          HlPort b = hl_component_port (to, (guint) g_rand_int_range (rand, 0, (gint32) hl_component_n_ports (to)));
          if (!hl_plant_can_connect (plant, from->id, a.key, to->id, b.key, NULL))
            continue;
          g_autofree char *id = hl_plant_free_id (plant, "");
          TAKE (hl_plant_with_stream (plant, hl_stream_new (g_intern_string (id), from->id, a.key, to->id, b.key)));
          TAKE (hl_settle (plant, NULL, NULL));
          HlSolution *s = solve (plant, last);
          hl_solution_unref (last);
          last = s;
          check (s);
          /* Every button of every finding can be pressed. */
          for (guint f = 0; f < hl_solution_n_findings (s); f++)
            for (guint m = 0; m < hl_solution_finding (s, f)->n_mends; m++)
              {
                g_autoptr (HlPlant) mended = hl_mend_apply (&hl_solution_finding (s, f)->mends[m], plant, NULL);
                g_assert_nonnull (mended);
              }
        }
#undef TAKE
      hl_solution_unref (last);
      hl_plant_unref (plant);
    }
}

static gpointer
solve_often (gpointer data)
{
  HlPlant *plant = data;
  HlSolution *s = NULL;
  for (int k = 0; k < 200; k++)
    {
      HlSolution *t = hl_solve (plant, s);
      hl_solution_unref (s);
      s = t;
    }
  return s;
}

/* The same plant in several threads at once. */
static void
test_threads (void)
{
  g_autoptr (HlPlant) plant = test_plant (test_reheat_plant);
  GThread *threads[4];
  for (guint k = 0; k < G_N_ELEMENTS (threads); k++)
    threads[k] = g_thread_new ("solve", solve_often, plant);
  double first = NAN;
  for (guint k = 0; k < G_N_ELEMENTS (threads); k++)
    {
      HlSolution *s = g_thread_join (threads[k]);
      double m = test_value (s, "T1.inlet.m");
      if (k == 0)
        first = m;
      g_assert_cmpfloat (m, ==, first);
      hl_solution_unref (s);
    }
}

int
main (int argc, char **argv)
{
  g_test_init (&argc, &argv, NULL);
  g_test_add_func ("/engine/robustness/random-edits", test_random_edits);
  g_test_add_func ("/engine/robustness/taking-apart", test_taking_apart);
  g_test_add_func ("/engine/robustness/random-drawings", test_random_drawings);
  g_test_add_func ("/engine/robustness/threads", test_threads);
  return g_test_run ();
}
