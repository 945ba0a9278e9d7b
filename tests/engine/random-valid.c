/* Random plants that can be solved: they are, from cold, by any order, and what comes out keeps every law.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "random-check.h"
#include "random-swap.h"
#include "engine/solution-private.h"
#include <math.h>
#include <string.h>
#include <time.h>

#define BALANCE    2e-9         /* of the largest flow or power of the plant */
#define SAME       1e-9         /* two ways to the same answer */
#define SECONDS    2.0          /* of processor time that one solve may take */

static int n_plants = 300;      /* HEATLOOM_RANDOM_PLANTS */
static guint32 first_seed = 1;  /* HEATLOOM_RANDOM_SEED */

/* What became of one plant. */
typedef struct {
  gboolean    failed, is_infeasible;
  gboolean    is_missed;        /* with values exchanged an answer was not found, and a finding says so */
  const char *stage;            /* where it failed */
  char       *text;             /* why it failed, or what cannot be */
  GString    *swaps;            /* what was exchanged */
  HlPlant    *plant;            /* the last that was solved */
  guint       n_swaps, n_unknowns, n_iterations, largest;
  gboolean    differs;          /* in another order another answer, sound as well */
  gboolean    other_answer;     /* from cold another one than the one that the values came from */
  double      balance, order, warm, seconds;
} Outcome;

static void
outcome_clear (Outcome *o)
{
  g_clear_pointer (&o->text, g_free);
  g_clear_pointer (&o->plant, hl_plant_unref);
  g_string_free (o->swaps, TRUE);
  o->swaps = NULL;
}

static double
processor_seconds (void)
{
  struct timespec now;
  clock_gettime (CLOCK_THREAD_CPUTIME_ID, &now);
  return (double) now.tv_sec + 1e-9 * (double) now.tv_nsec;
}

static HlSolution *
timed_solve (HlPlant *plant, const HlSolution *start, Outcome *o)
{
  double begin = processor_seconds ();
  HlSolution *s = hl_solve (plant, start);
  o->seconds = fmax (o->seconds, processor_seconds () - begin);
  return s;
}

static void G_GNUC_PRINTF (3, 4)
fail (Outcome *o, const char *stage, const char *format, ...)
{
  va_list args;
  if (o->failed)
    return;
  va_start (args, format);
  g_free (o->text);
  o->text = g_strdup_vprintf (format, args);
  va_end (args);
  o->stage = stage;
  o->failed = TRUE;
}

/* With any value given for any other there is no promise that the answer is found from cold; but never silence. */
static void
miss (Outcome *o, const HlSolution *s, const char *stage, const char *text)
{
  if (o->n_swaps == 0 || !hl_solution_has_grade (s, HL_GRADE_ERROR))
    {
      fail (o, stage, "%s: %s", stage, text);
      return;
    }
  o->is_missed = TRUE;
  o->stage = stage;
  g_free (o->text);
  o->text = g_strdup_printf ("%s: %s", stage, text);
}

static const char *
first_error (const HlSolution *s)
{
  return hl_solution_n_findings (s) > 0 ? hl_solution_finding (s, 0)->text : "no finding";
}

/* A plant may be impossible after all: then the engine has numbers for it and says so, and so do the numbers. */
static gboolean
may_be_impossible (const HlSolution *s, Outcome *o)
{
  if (!s->is_complete)
    return FALSE;
  RandomCheck check = random_check (s);
  if (check.n_broken_laws == 0 || !hl_solution_has_grade (s, HL_GRADE_ERROR))
    return FALSE;
  o->is_infeasible = TRUE;
  g_free (o->text);
  o->text = g_strdup_printf ("%s | %s", check.text, first_error (s));
  return TRUE;
}

static void
look_at (const HlSolution *s, const char *how, Outcome *o)
{
  RandomCheck check = random_check (s);
  o->balance = fmax (o->balance, fmax (check.mass, check.energy));
  if (!(check.mass <= BALANCE && check.energy <= BALANCE) || check.given > 2e-8 || check.machine > 2e-8 || check.n_broken_laws > 0)
    fail (o, "laws", "%s: %s", how, check.text);
}

/* Values exchanged one after the other, each from the answer of the one before. */
static HlSolution *
exchange_values (HlSolution *s, const RandomDesign *design, Outcome *o)
{
  for (int k = 0; k < design->swaps && !o->failed && !o->is_missed; k++)
    {
      g_autofree char *what = NULL;
      HlPlant *plant = random_swap (s, design->seed, k, TRUE, &what);
      if (plant == NULL)
        continue;
      g_string_append_printf (o->swaps, "\n    %s", what);
      HlSolution *t = timed_solve (plant, s, o);
      hl_plant_unref (o->plant);
      o->plant = plant;
      o->n_swaps++;
      if (!hl_solution_is_solved (t))
        miss (o, t, "exchange", first_error (t));
      else
        look_at (t, what, o);
      hl_solution_unref (s);
      s = t;
    }
  return s;
}

static void
try_other_ways (const HlSolution *cold, guint32 seed, Outcome *o)
{
  char where[400] = "";
  g_autoptr (HlPlant) shuffled = random_reorder (o->plant, seed);
  g_autoptr (HlSolution) other = timed_solve (shuffled, NULL, o);
  g_autoptr (HlSolution) warm = timed_solve (o->plant, cold, o);
  if (!hl_solution_is_solved (other))
    miss (o, other, "order", first_error (other));
  else if (!((o->order = random_compare (cold, other, where, sizeof where)) <= SAME))
    {
      /* Exchanged values may have several answers, or hang on each other so closely that the last digits are open. */
      RandomCheck check = random_check (other);
      o->differs = o->n_swaps > 0 && check.n_broken_laws == 0 && check.energy <= BALANCE && check.given <= 2e-8;
      if (!o->differs)
        fail (o, "order", "in another order off by %.3g: %s", o->order, where);
    }
  if (!hl_solution_is_solved (warm))
    fail (o, "warm", "warm: %s", first_error (warm));
  else if (!((o->warm = random_compare (cold, warm, where, sizeof where)) <= SAME))
    fail (o, "warm", "warm off by %.3g: %s", o->warm, where);
}

static Outcome
try_design (const RandomDesign *design)
{
  Outcome o = { .swaps = g_string_new (NULL) };
  char where[400];
  g_autofree char *text = random_plant_text (design);
  o.plant = test_plant (text);
  HlSolution *s = timed_solve (o.plant, NULL, &o);
  if (!hl_solution_is_solved (s))
    {
      if (!may_be_impossible (s, &o))
        fail (&o, "cold", "cold: %s", first_error (s));
      hl_solution_unref (s);
      return o;
    }
  look_at (s, "cold", &o);
  s = exchange_values (s, design, &o);
  if (!o.failed && !o.is_missed)
    {
      g_autoptr (HlSolution) cold = timed_solve (o.plant, NULL, &o);
      HlSolveEffort effort;
      hl_solution_effort (cold, &effort);
      o.n_unknowns = effort.n_unknowns;
      o.n_iterations = effort.n_iterations;
      o.largest = effort.largest_block;
      if (!hl_solution_is_solved (cold))
        miss (&o, cold, "cold with exchanged values", first_error (cold));
      else
        {
          look_at (cold, "cold", &o);
          o.other_answer = random_compare (s, cold, where, sizeof where) > 1e-6;
          try_other_ways (cold, design->seed, &o);
        }
    }
  if (o.seconds > SECONDS)
    fail (&o, "time", "took %.2f s", o.seconds);
  hl_solution_unref (s);
  return o;
}

/* --- failures ------------------------------------------------------------------------ */

static void
report (const RandomDesign *design)
{
  RandomDesign least = *design, simpler;
  Outcome first = try_design (design);
  const char *stage = first.stage;
  int step = 0;
  outcome_clear (&first);
  while (random_simpler (&least, &step, &simpler))
    {
      Outcome o = try_design (&simpler);
      if ((o.failed || o.is_missed) && o.stage == stage)
        {
          least = simpler;
          step = 0;
        }
      outcome_clear (&o);
    }
  Outcome o = try_design (&least);
  g_autofree char *was = random_describe (design), *is = random_describe (&least), *name = g_strdup_printf ("random-%u.heatloom", design->seed);
  g_autofree char *path = g_build_filename (g_get_tmp_dir (), name, NULL);
  hl_plant_save (o.plant, path, NULL);
  g_test_message ("%s %s\n  smallest: %s\n  %s\n  plant: %s%s", o.failed ? "FAILED" : "not found:", was, is, o.text, path, o.swaps->str);
  outcome_clear (&o);
}

/* --- the run ---------------------------------------------------------------------------- */

typedef struct {
  guint  n, n_solved, n_infeasible, n_missed, n_failed, n_swapped, n_swaps, n_other, n_differ, by_sink[N_SINKS], by_reheats[3], most_components, least_components;
  double components, unknowns, iterations, largest, balance, order, warm, seconds;
  guint  most_unknowns, most_largest, most_iterations;
} Log;

static void
add_to_log (Log *log, const RandomDesign *design, const Outcome *o)
{
  guint n = hl_plant_n_components (o->plant);
  log->n++;
  log->n_infeasible += o->is_infeasible;
  log->n_failed += o->failed;
  log->n_missed += !o->failed && o->is_missed;
  log->seconds = fmax (log->seconds, o->seconds);
  log->least_components = log->n == 1 ? n : MIN (log->least_components, n);
  log->most_components = MAX (log->most_components, n);
  if (o->failed || o->is_infeasible || o->is_missed)
    return;
  log->n_solved++;
  log->components += n;
  log->n_swapped += o->n_swaps > 0;
  log->n_swaps += o->n_swaps;
  log->n_other += o->other_answer;
  log->n_differ += o->differs;
  log->by_sink[design->sink]++;
  log->by_reheats[design->reheats]++;
  log->unknowns += o->n_unknowns;
  log->iterations += o->n_iterations;
  log->largest += o->largest;
  log->most_unknowns = MAX (log->most_unknowns, o->n_unknowns);
  log->most_largest = MAX (log->most_largest, o->largest);
  log->most_iterations = MAX (log->most_iterations, o->n_iterations);
  log->balance = fmax (log->balance, o->balance);
  log->order = fmax (log->order, o->differs ? 0.0 : o->order);
  log->warm = fmax (log->warm, o->warm);
}

static void
print_log (const Log *log)
{
  double n = MAX (log->n_solved, 1);
  g_test_message ("seeds %u to %u: %u plants, %u solved, %u impossible and reported, %u with exchanged values not found and reported, %u failed",
                  first_seed, first_seed + log->n - 1, log->n, log->n_solved, log->n_infeasible, log->n_missed, log->n_failed);
  g_test_message ("components %u to %u, mean %.1f; unknowns mean %.0f, most %u; largest block mean %.0f, most %u; iterations mean %.0f, most %u",
                  log->least_components, log->most_components, log->components / n, log->unknowns / n, log->most_unknowns, log->largest / n, log->most_largest,
                  log->iterations / n, log->most_iterations);
  g_test_message ("reheats 0/1/2: %u/%u/%u; condenser with own water %u, lines %u, tower %u, air %u, plain %u; back-pressure process %u, district %u",
                  log->by_reheats[0], log->by_reheats[1], log->by_reheats[2], log->by_sink[0], log->by_sink[1], log->by_sink[2], log->by_sink[3], log->by_sink[4],
                  log->by_sink[5], log->by_sink[6]);
  g_test_message ("%u plants with %u values exchanged for others, %u of them with another answer from cold, %u with another one in another order", log->n_swapped, log->n_swaps,
                  log->n_other, log->n_differ);
  g_test_message ("worst balance %.2e, other order %.2e, warm %.2e; longest solve %.3f s", log->balance, log->order, log->warm, log->seconds);
}

static void
test_random_plants (void)
{
  Log log = { 0 };
  guint reported = 0;
  for (int k = 0; k < n_plants; k++)
    {
      RandomDesign design = random_design (first_seed + (guint32) k);
      Outcome o = try_design (&design);
      add_to_log (&log, &design, &o);
      if (o.failed || o.is_missed)
        {
          if (g_test_verbose ())
            g_test_message ("seed %u: %s", design.seed, o.text);
          if ((o.failed || g_test_verbose ()) && reported++ < 10)
            report (&design);
        }
      else if (o.is_infeasible && g_test_verbose ())
        g_test_message ("seed %u impossible: %s", design.seed, o.text);
      outcome_clear (&o);
    }
  print_log (&log);
  g_assert_cmpuint (log.n_failed, ==, 0);
  g_assert_cmpuint (log.n_infeasible, <=, log.n / 20);
  g_assert_cmpuint (log.n_missed, <=, log.n / 40);
  g_assert_cmpuint (log.n_differ, <=, log.n / 200);
}

int
main (int argc, char **argv)
{
  const char *count = g_getenv ("HEATLOOM_RANDOM_PLANTS"), *seed = g_getenv ("HEATLOOM_RANDOM_SEED");
  if (count != NULL)
    n_plants = atoi (count);
  if (seed != NULL)
    first_seed = (guint32) g_ascii_strtoull (seed, NULL, 10);
  g_test_init (&argc, &argv, NULL);
  g_test_add_func ("/engine/random/valid", test_random_plants);
  return g_test_run ();
}
