/* Times of a whole edit and of its phases, for the demo plants: Vesper Point is one of the 300 MW class.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "plant/document.h"
#include "plants.h"
#include "engine/solution-private.h"

#define ROUNDS  100       /* of which the mean is taken */
#define BATCHES 10        /* of which the best counts: the machine may have other work */

typedef struct { double build, structure, numbers, results, whole; } Times;

static void
add (Times *sum, const HlSolution *solution)
{
  HlSolveEffort effort;
  hl_solution_effort (solution, &effort);
  sum->build += effort.seconds_build * 1e6 / ROUNDS;
  sum->structure += effort.seconds_structure * 1e6 / ROUNDS;
  sum->numbers += effort.seconds_numbers * 1e6 / ROUNDS;
  sum->results += effort.seconds_results * 1e6 / ROUNDS;
  sum->whole += hl_solution_seconds (solution) * 1e6 / ROUNDS;
}

static void
keep_best (Times *best, const Times *other)
{
  best->build = MIN (best->build, other->build);
  best->structure = MIN (best->structure, other->structure);
  best->numbers = MIN (best->numbers, other->numbers);
  best->results = MIN (best->results, other->results);
  best->whole = MIN (best->whole, other->whole);
}

static Times
time_solves (HlPlant *plant, const HlSolution *start)
{
  Times best = { 1e9, 1e9, 1e9, 1e9, 1e9 };
  for (int batch = 0; batch < BATCHES; batch++)
    {
      Times sum = { 0.0 };
      for (int round = 0; round < ROUNDS; round++)
        {
          g_autoptr (HlSolution) solution = hl_solve (plant, start);
          add (&sum, solution);
        }
      keep_best (&best, &sum);
    }
  return best;
}

/* One value typed: new plant, settled, solved from the last solution, the old one dropped. */
static double
time_edits (HlPlant *plant, const HlAddress *address, double value)
{
  HlPlant *present = hl_plant_ref (plant);
  HlSolution *last = hl_solve (present, NULL);
  double best = 1e9;
  gint64 begin = g_get_monotonic_time ();
  for (int round = 0; round < ROUNDS * BATCHES; round++)
    {
      GArray *yielded;
      if (round > 0 && round % ROUNDS == 0)
        {
          best = MIN (best, (double) (g_get_monotonic_time () - begin) / ROUNDS);
          begin = g_get_monotonic_time ();
        }
      HlValue next = { .origin = HL_ORIGIN_GIVEN, .value = value * (1.0 + 1e-3 * (round % 20)) };
      g_autoptr (HlPlant) edited = hl_plant_with_value (present, address, &next, NULL);
      HlPlant *settled = hl_settle (edited, address, &yielded);
      HlSolution *solution = hl_solve (settled, last);
      g_array_unref (yielded);
      hl_solution_unref (last);
      hl_plant_unref (present);
      last = solution;
      present = settled;
    }
  if (!hl_solution_is_solved (last))
    {
      test_print (last);
      g_error ("the edited plant is not solved");
    }
  hl_solution_unref (last);
  hl_plant_unref (present);
  return best;
}

static void
bench (const char *name, HlPlant *plant)
{
  g_autoptr (HlSolution) cold = hl_solve (plant, NULL);
  g_autoptr (HlSolution) warm = hl_solve (plant, cold);
  HlSolveEffort effort;
  HlAddress address = hl_address_component (g_intern_static_string ("T1"), g_intern_static_string ("inlet.p"));
  double value = 0.0;
  test_assert_solved (cold);
  hl_solution_effort (cold, &effort);
  Times c = time_solves (plant, NULL), w = time_solves (plant, cold);
  if (hl_plant_value (plant, &address) == NULL)
    address = hl_address_component (g_intern_static_string ("B1"), g_intern_static_string ("steam.p"));
  const HlValue *typed = hl_plant_value (plant, &address);
  value = typed != NULL ? typed->value : 60e5;
  double edit = time_edits (plant, &address, value);
  g_print ("%-22s %8u %7u %8u | %6.0f %6.0f %6.0f %6.0f %6.0f | %6.0f %6.0f %6.0f | %6.0f\n", name, effort.n_unknowns, effort.n_blocks, effort.largest_block,
           c.build, c.structure, c.numbers, c.results, c.whole, w.numbers, w.results, w.whole, edit);
  g_print ("%-22s equations evaluated: cold %" G_GUINT64_FORMAT ", warm %" G_GUINT64_FORMAT "; property calls: cold %" G_GUINT64_FORMAT ", warm %" G_GUINT64_FORMAT "\n",
           "", cold->numbers.n_evaluations, warm->numbers.n_evaluations, cold->numbers.n_property_calls, warm->numbers.n_property_calls);
}

/* Growth: so many 300 MW-class plants in one file. */
static void
bench_copies (HlPlant *one, int n)
{
  g_autoptr (HlPlant) plant = test_plant_copies_of (one, n, 250.0);
  g_autoptr (HlSolution) cold = hl_solve (plant, NULL);
  Times w = { 0.0 };
  test_assert_solved (cold);
  int rounds = MAX (200 / n, 4);
  for (int round = 0; round < rounds; round++)
    {
      g_autoptr (HlSolution) warm = hl_solve (plant, cold);
      add (&w, warm);
    }
  double factor = (double) ROUNDS / rounds;
  g_print ("%3d such plants: warm %.0f us: build %.0f, structure %.0f, numbers %.0f, results %.0f\n", n, w.whole * factor, w.build * factor, w.structure * factor,
           w.numbers * factor, w.results * factor);
}

/* What a variant costs: an edit of it (its changes anew, and their plant), and marks of it. */
static void
bench_variants (const char *name, HlPlant *base, HlPlant *other)
{
  g_autoptr (HlDocument) document = hl_document_new (hl_plant_ref (base)), two = hl_document_with_variant (document, "other", HL_DOCUMENT_BASE, NULL);
  g_autoptr (HlDocument) with = hl_document_with_plant (two, 0, other);
  double best = G_MAXDOUBLE;
  for (int batch = 0; batch < BATCHES; batch++)
    {
      gint64 start = g_get_monotonic_time ();
      for (int round = 0; round < ROUNDS; round++)
        {
          g_autoptr (HlDocument) edited = hl_document_with_plant (with, 0, hl_document_plant (with, 0));
          g_assert_nonnull (hl_document_plant (edited, 0));
        }
      best = MIN (best, (double) (g_get_monotonic_time () - start) / ROUNDS);
    }
  g_print ("%-22s variant of %u changes: edit %.0f us\n", name, hl_document_changes (with, 0)->len, best);
}

int
main (int argc, char **argv)
{
  static const char *const demos[] = { "ferry-lane", "linden-row", "tallow-fen", "marrow-quay", "vesper-point" };
  g_autoptr (HlPlant) last = NULL;
  if (argc != 2)
    {
      g_printerr ("usage: engine-bench FOLDER-OF-THE-DEMO-PLANTS\n");
      return 2;
    }
  g_print ("microseconds, best of %d means of %d\n%-22s %8s %7s %8s | %6s %6s %6s %6s %6s | %6s %6s %6s | %6s\n", BATCHES, ROUNDS, "plant", "unknowns", "blocks", "largest",
           "build", "struct", "cold", "result", "whole", "warm", "result", "whole", "edit");
  for (guint k = 0; k < G_N_ELEMENTS (demos); k++)
    {
      g_autofree char *name = g_strconcat (demos[k], ".heatloom", NULL), *path = g_build_filename (argv[1], name, NULL);
      g_autoptr (GError) error = NULL;
      g_autoptr (HlPlant) plant = hl_plant_load (path, &error);
      if (plant == NULL)
        g_error ("%s", error->message);
      bench (demos[k], plant);
      g_clear_pointer (&last, hl_plant_unref);
      last = hl_plant_ref (plant);
    }
  {
    g_autofree char *path = g_build_filename (argv[1], "tallow-fen.heatloom", NULL);
    g_autoptr (HlDocument) fen = hl_document_load (path, NULL);
    g_autoptr (HlPlant) empty = hl_plant_new ();
    bench_variants ("tallow-fen, river", hl_document_plant (fen, HL_DOCUMENT_BASE), hl_document_plant (fen, 0));
    bench_variants ("tallow-fen, from none", empty, hl_document_plant (fen, HL_DOCUMENT_BASE));
  }
  g_autoptr (HlPlant) reheat = test_plant (test_reheat_plant);
  bench ("reheat, two heaters", reheat);
  for (int n = 1; n <= 50; n = n == 1 ? 10 : 5 * n)
    bench_copies (last, n);
  return 0;
}
