/* Times of a whole edit and of its phases, side by side: demo plants, one of the 300 MW class, chains of it; and the floor below which
 * no solver comes, the property calls.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "plant/document.h"
#include "plants.h"
#include "engine/solution-private.h"
#include <malloc.h>
#include <time.h>

#define ROUNDS  40        /* of which the mean is taken */
#define BATCHES 25        /* of which the best counts: the machine may have other work */

typedef struct { double build, structure, numbers, results, whole; } Times;

/* Processor time of this thread [us]: other work on the machine does not count. */
static double
now (void)
{
  struct timespec t;
  clock_gettime (CLOCK_THREAD_CPUTIME_ID, &t);
  return 1e6 * (double) t.tv_sec + 1e-3 * (double) t.tv_nsec;
}

static void
keep_best (Times *best, const HlSolution *solution)
{
  HlSolveEffort effort;
  hl_solution_effort (solution, &effort);
  best->build = MIN (best->build, effort.seconds_build * 1e6);
  best->structure = MIN (best->structure, effort.seconds_structure * 1e6);
  best->numbers = MIN (best->numbers, effort.seconds_numbers * 1e6);
  best->results = MIN (best->results, effort.seconds_results * 1e6);
}

static Times
time_solves (HlPlant *plant, const HlSolution *start, int rounds)
{
  Times best = { 1e12, 1e12, 1e12, 1e12, 1e12 };
  for (int batch = 0; batch < BATCHES; batch++)
    {
      double begin = now ();
      for (int round = 0; round < rounds; round++)
        {
          g_autoptr (HlSolution) solution = hl_solve (plant, start);
          keep_best (&best, solution);
        }
      best.whole = MIN (best.whole, (now () - begin) / rounds);
    }
  return best;
}

/* One value typed: new plant, settled, solved from the last solution, the old one dropped. */
static double
time_edits (HlPlant *plant, const HlAddress *address, double value, int rounds)
{
  HlPlant *present = hl_plant_ref (plant);
  HlSolution *last = hl_solve (present, NULL);
  double best = 1e12;
  for (int batch = 0; batch < BATCHES; batch++)
    {
      double begin = now ();
      for (int round = 0; round < rounds; round++)
        {
          GArray *yielded;
          HlValue next = { .origin = HL_ORIGIN_GIVEN, .value = value * (1.0 + 1e-3 * (round % 20)) };
          g_autoptr (HlPlant) edited = hl_plant_with_value (present, address, &next, NULL);
          HlPlant *settled = hl_settle_from (edited, address, last, &yielded);
          HlSolution *solution = hl_solve (settled, last);
          g_array_unref (yielded);
          hl_solution_unref (last);
          hl_plant_unref (present);
          last = solution;
          present = settled;
        }
      if (batch > 0)       /* the first makes an assumed value a given one */
        best = MIN (best, (now () - begin) / rounds);
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

/* Mean time of a property call at the states of the plant [us]. */
static double
time_of_a_call (const HlSolution *solution)
{
  guint n = hl_plant_n_streams (hl_solution_plant (solution)), calls = 0;
  double best = 1e12;
  for (int batch = 0; batch < BATCHES; batch++)
    {
      double begin = now ();
      calls = 0;
      for (int round = 0; round < 20; round++)
        for (guint k = 0; k < n; k++)
          {
            HlStreamResult r;
            HlState st;
            hl_solution_stream (solution, k, &r);
            calls += hl_fluid_state_ph (r.fluid, r.state.p, r.state.h, &st) == HL_OK;
          }
      best = MIN (best, (now () - begin) / MAX (calls, 1));
    }
  return best;
}

static HlAddress
address_to_edit (HlPlant *plant, double *value)
{
  static const struct { const char *id, *key; } rows[] = { { "T1", "inlet.p" }, { "B1", "steam.p" }, { "T1_1", "inlet.p" } };
  for (guint k = 0; k < G_N_ELEMENTS (rows); k++)
    {
      HlAddress address = hl_address_component (g_intern_string (rows[k].id), g_intern_string (rows[k].key));
      const HlValue *typed = hl_plant_find_component (plant, address.id) != NULL ? hl_plant_value (plant, &address) : NULL;
      if (typed == NULL)
        continue;
      *value = typed->value;
      return address;
    }
  g_error ("nothing to edit");
}

static void
bench (const char *name, HlPlant *plant, int rounds)
{
  gsize before = mallinfo2 ().uordblks;
  g_autoptr (HlSolution) cold = hl_solve (plant, NULL);
  gsize held = mallinfo2 ().uordblks - before;
  g_autoptr (HlSolution) warm = hl_solve (plant, cold);
  HlSolveEffort effort;
  double value, call = time_of_a_call (cold);
  test_assert_solved (cold);
  hl_solution_effort (cold, &effort);
  Times c = time_solves (plant, NULL, rounds), w = time_solves (plant, cold, rounds);
  HlAddress address = address_to_edit (plant, &value);
  double edit = time_edits (plant, &address, value, rounds);
  g_print ("%-22s %6u %6u %5u | %7.0f %7.0f %7.0f %7.0f %8.0f | %7.0f %7.0f %7.0f %8.0f | %8.0f | %6.0f kB | %5" G_GUINT64_FORMAT " %5" G_GUINT64_FORMAT " %4.0f ns %3.0f %% %3.0f %%\n",
           name, effort.n_unknowns, effort.n_blocks, effort.largest_block, c.build, c.structure, c.numbers, c.results, c.whole, w.build, w.numbers, w.results, w.whole, edit,
           (double) held / 1024.0, cold->numbers.n_property_calls, warm->numbers.n_property_calls, 1e3 * call, 100.0 * call * (double) cold->numbers.n_property_calls / c.numbers,
           100.0 * call * (double) warm->numbers.n_property_calls / w.numbers);
}

static void
bench_copies (int n)
{
  g_autoptr (HlPlant) plant = test_plant_copies (test_large_plant, n, 250.0);
  g_autofree char *name = g_strdup_printf ("%d of it in one file", n);
  bench (name, plant, MAX (ROUNDS / n, 2));
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
  static const char *const demos[] = { "ferry-lane", "linden-row", "tallow-fen" };
  if (argc != 2)
    {
      g_printerr ("usage: engine-bench FOLDER-OF-THE-DEMO-PLANTS\n");
      return 2;
    }
  g_print ("microseconds, the best of %d; whole and edit: processor time; calls: property calls cold, warm, time of one, their share of numbers cold, warm\n"
           "%-22s %6s %6s %5s | %7s %7s %7s %7s %8s | %7s %7s %7s %8s | %8s | %9s | calls\n", BATCHES, "plant", "unkn.", "blocks", "most",
           "build", "struct.", "cold", "results", "whole", "build", "warm", "results", "whole", "edit", "memory");
  for (guint k = 0; k < G_N_ELEMENTS (demos); k++)
    {
      g_autofree char *name = g_strconcat (demos[k], ".heatloom", NULL), *path = g_build_filename (argv[1], name, NULL);
      g_autoptr (GError) error = NULL;
      g_autoptr (HlPlant) plant = hl_plant_load (path, &error);
      if (plant == NULL)
        g_error ("%s", error->message);
      bench (demos[k], plant, ROUNDS);
    }
  {
    g_autofree char *path = g_build_filename (argv[1], "tallow-fen.heatloom", NULL);
    g_autoptr (HlDocument) fen = hl_document_load (path, NULL);
    g_autoptr (HlPlant) empty = hl_plant_new ();
    bench_variants ("tallow-fen, river", hl_document_plant (fen, HL_DOCUMENT_BASE), hl_document_plant (fen, 0));
    bench_variants ("tallow-fen, from none", empty, hl_document_plant (fen, HL_DOCUMENT_BASE));
  }
  g_autoptr (HlPlant) reheat = test_plant (test_reheat_plant), large = test_plant (test_large_plant);
  bench ("reheat, two heaters", reheat, ROUNDS);
  bench ("300 MW, seven heaters", large, ROUNDS);
  static const int copies[] = { 1, 2, 5, 10, 50 };
  for (guint k = 0; k < G_N_ELEMENTS (copies); k++)
    bench_copies (copies[k]);
  return 0;
}
