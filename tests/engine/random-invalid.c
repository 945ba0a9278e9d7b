/* Random plants that are wrong in one way or several: a finding each time, in time, and never a wrong "solved".
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "random-check.h"
#include "random-swap.h"
#include "engine/solution-private.h"
#include <math.h>
#include <time.h>

#define SECONDS 2.0             /* of processor time that one plant may take, settling included */

static int n_plants = 300;      /* HEATLOOM_RANDOM_PLANTS */
static guint32 first_seed = 1;  /* HEATLOOM_RANDOM_SEED */

typedef enum { WRONG_MISSING, WRONG_SURPLUS, WRONG_CONTRADICTION, WRONG_CUT, WRONG_REMOVED, WRONG_CROSSING, WRONG_NUMBER, WRONG_ORDER, WRONG_MANY, N_WRONGS } Wrong;
static const char *const names[N_WRONGS] = { "value missing", "value too many", "values that contradict", "line cut", "component removed", "temperatures that cross",
                                             "wild numbers", "pressures out of order", "several of these" };

/* What must come of it: an error by all means; or either an error, or an answer that keeps every law. */
typedef struct { HlPlant *plant; gboolean must_fail, is_changed; char text[300]; } Case;

/* Where the plant refuses a value outright, it stays as it was. */
static void
take (Case *c, HlPlant *next)
{
  if (next == NULL)
    return;
  c->is_changed = TRUE;
  hl_plant_unref (c->plant);
  c->plant = next;
}

static void
note (Case *c, const char *what, const HlAddress *address, double value)
{
  g_autofree char *text = address != NULL ? hl_address_to_text (address) : g_strdup (""), *before = g_strdup (c->text);
  g_snprintf (c->text, sizeof c->text, "%s %s %s %.6g", before, what, text, value);
}

/* The k-th value that was put in anywhere; FALSE beyond the last. */
static gboolean
nth_value (HlPlant *plant, guint k, HlAddress *address, double *value)
{
  for (guint n = 0; n < hl_plant_n_components (plant); n++)
    {
      const HlComponent *c = hl_plant_component (plant, n);
      if (k < c->values.n)
        {
          *address = hl_address_component (c->id, c->values.entries[k].key);
          *value = c->values.entries[k].value.value;
          return TRUE;
        }
      k -= c->values.n;
    }
  const HlValues *values = hl_plant_values (plant);
  if (k >= values->n)
    return FALSE;
  *address = hl_address_plant (values->entries[k].key);
  *value = values->entries[k].value.value;
  return TRUE;
}

static gboolean
any_value (HlPlant *plant, guint32 seed, int count, HlAddress *address, double *value)
{
  guint n = 0;
  while (nth_value (plant, n, address, value))
    n++;
  return n > 0 && nth_value (plant, (guint) random_below (seed, "wrong-value", count, (int) n), address, value);
}

/* Does the value settle anything?  One that a group's efficiency overrides, or a line replaces, may go unnoticed. */
static gboolean
matters (const HlSolution *s, const HlAddress *address)
{
  const HlSystem *system = s->model->system;
  for (guint k = 0; k < system->specs->len; k++)
    {
      const HlSpec *spec = hl_system_spec (system, k);
      if (hl_address_equal (&spec->address, address))
        return system->fixed_by[system->root[spec->var]] == (int) k;
    }
  return FALSE;
}

/* Without it others of the equations of its component apply, or only results beside the balances are lacking. */
static gboolean
is_a_form (const HlAddress *address)
{
  return g_str_has_prefix (address->key, "group_efficiency") || g_str_equal (address->key, "return_fraction") || g_str_equal (address->key, "isentropic_efficiency")
         || g_str_equal (address->key, "cleanliness") || g_str_equal (address->key, "fuel_exergy_ratio") || g_str_equal (address->key, "heat_loss");
}

static void
make_missing (Case *c, const HlSolution *s, guint32 seed, int count)
{
  HlAddress address;
  double value;
  for (int attempt = 0; attempt < 20; attempt++)
    if (any_value (c->plant, seed, 20 * count + attempt, &address, &value) && matters (s, &address) && !is_a_form (&address))
      {
        note (c, "without", &address, value);
        take (c, hl_plant_with_value (c->plant, &address, NULL, NULL));
        c->must_fail = TRUE;
        return;
      }
}

/* Any found quantity typed, off by a part or just as it is: one value too many either way. */
static void
make_surplus (Case *c, const HlSolution *s, guint32 seed, int count, double off)
{
  for (int attempt = 0; attempt < 40; attempt++)
    {
      const HlComponent *component = hl_plant_component (c->plant, (guint) random_below (seed, "surplus-component", 40 * count + attempt, (int) hl_plant_n_components (c->plant)));
      guint n = hl_component_n_quantities (component);
      if (n == 0)
        continue;
      HlAddress address = hl_address_component (component->id, hl_component_quantity (component, (guint) random_below (seed, "surplus-quantity", 40 * count + attempt, (int) n)).key);
      double value;
      if (is_a_form (&address) || hl_plant_value_wherever (c->plant, &address, NULL) != NULL || hl_model_find_var (s->model, &address) < 0
          || !hl_solution_value (s, &address, &value) || !(fabs (value) > 1e-9))
        continue;
      HlValue given = { .origin = HL_ORIGIN_GIVEN, .value = value * (1.0 + off) };
      HlPlant *typed = hl_plant_with_value (c->plant, &address, &given, NULL);
      if (typed == NULL)
        continue;
      note (c, "also", &address, given.value);
      take (c, typed);
      c->must_fail = TRUE;
      return;
    }
}

/* A line gone leaves two open ends; one that only a vessel may have or not is none. */
static void
make_cut (Case *c, guint32 seed, int count)
{
  const HlStream *stream = hl_plant_stream (c->plant, (guint) random_below (seed, "cut", count, (int) hl_plant_n_streams (c->plant)));
  const HlComponent *from = hl_plant_find_component (c->plant, stream->from_id), *to = hl_plant_find_component (c->plant, stream->to_id);
  guint a, b;
  const char *ids[] = { stream->id, NULL };
  HlAddress address = hl_address_stream (stream->id, g_intern_static_string ("m"));
  g_assert_true (hl_component_find_port (from, stream->from_port, &a) && hl_component_find_port (to, stream->to_port, &b));
  c->must_fail |= !hl_component_port (from, a).kind->is_optional || !hl_component_port (to, b).kind->is_optional;
  note (c, "cut", &address, 0.0);
  take (c, hl_plant_without (c->plant, ids));
}

static void
make_removed (Case *c, guint32 seed, int count)
{
  const HlComponent *component = hl_plant_component (c->plant, (guint) random_below (seed, "remove", count, (int) hl_plant_n_components (c->plant)));
  const char *ids[] = { component->id, NULL };
  HlAddress address = hl_address_component (component->id, g_intern_static_string (""));
  gboolean had_lines = FALSE;
  for (guint k = 0; k < hl_plant_n_streams (c->plant); k++)
    had_lines |= hl_plant_stream (c->plant, k)->from_id == component->id || hl_plant_stream (c->plant, k)->to_id == component->id;
  note (c, "removed", &address, 0.0);
  c->must_fail |= had_lines;
  take (c, hl_plant_without (c->plant, ids));
}

/* A difference of temperatures that asks for heat from cold to hot. */
static void
make_crossing (Case *c, guint32 seed)
{
  static const struct { const char *key; double value; } rows[] = { { "terminal_difference", -40.0 }, { "initial_difference", -15.0 }, { "drain_approach", -30.0 },
                                                                    { "pinch", -20.0 }, { "cooling_rise", -5.0 }, { "terminal_difference", -90.0 } };
  for (int attempt = 0; attempt < 200 && !c->is_changed; attempt++)
    {
      guint row = (guint) random_below (seed, "crossing", attempt, G_N_ELEMENTS (rows));
      const HlComponent *component = hl_plant_component (c->plant, (guint) random_below (seed, "crossing-component", attempt, (int) hl_plant_n_components (c->plant)));
      const char *key = g_intern_string (rows[row].key);
      if (hl_values_find (&component->values, key) == NULL)
        continue;
      HlAddress address = hl_address_component (component->id, key);
      HlValue value = { .origin = HL_ORIGIN_GIVEN, .value = rows[row].value };
      note (c, "set", &address, value.value);
      take (c, hl_plant_with_value (c->plant, &address, &value, NULL));
    }
}

static void
make_number (Case *c, guint32 seed, int count)
{
  HlAddress address;
  double value;
  if (!any_value (c->plant, seed, 900 + count, &address, &value))
    return;
  double by = random_number (seed, "wild-how", count);
  double wild = by < 0.2 ? 0.0 : by < 0.35 ? -value : by < 0.5 ? value * 1e3 : by < 0.65 ? value * 1e-3 : by < 0.75 ? 1e12 : by < 0.85 ? -1e12
    : value * random_decades (seed, "wild-by", count, 0.2, 5.0);
  HlValue given = { .origin = HL_ORIGIN_GIVEN, .value = wild };
  note (c, "set", &address, wild);
  take (c, hl_plant_with_value (c->plant, &address, &given, NULL));
}

/* Two pressures along the expansion change places. */
static void
make_disorder (Case *c, guint32 seed)
{
  for (int attempt = 0; attempt < 40; attempt++)
    {
      HlAddress a, b;
      double p, q;
      if (!any_value (c->plant, seed, 2000 + attempt, &a, &p) || !any_value (c->plant, seed, 3000 + attempt, &b, &q) || !g_str_has_suffix (a.key, ".p") || !g_str_has_suffix (b.key, ".p")
          || hl_address_equal (&a, &b) || fabs (log (p / q)) < 0.2)
        continue;
      HlValue first = { .origin = HL_ORIGIN_GIVEN, .value = q }, second = { .origin = HL_ORIGIN_GIVEN, .value = p };
      note (c, "exchanged with the next", &a, q);
      note (c, "", &b, p);
      take (c, hl_plant_with_value (c->plant, &a, &first, NULL));
      take (c, hl_plant_with_value (c->plant, &b, &second, NULL));
      return;
    }
}

static void
spoil (Case *c, const HlSolution *s, Wrong wrong, guint32 seed, int count)
{
  double off = random_between (seed, "surplus-off", count, 0.01, 0.2);
  switch (wrong)
    {
    case WRONG_MISSING: make_missing (c, s, seed, count); break;
    case WRONG_SURPLUS: make_surplus (c, s, seed, count, 0.0); break;
    case WRONG_CONTRADICTION: make_surplus (c, s, seed, count, random_chance (seed, "surplus-sign", count, 0.5) ? off : -off); break;
    case WRONG_CUT: make_cut (c, seed, count); break;
    case WRONG_REMOVED: make_removed (c, seed, count); break;
    case WRONG_CROSSING: make_crossing (c, seed); break;
    case WRONG_NUMBER:
      for (int k = random_below (seed, "how-many", count, 3); k >= 0; k--)
        make_number (c, seed, 10 * count + k);
      break;
    case WRONG_ORDER: make_disorder (c, seed); break;
    default:
      for (int k = 0; k < 3 && hl_plant_n_components (c->plant) > 0 && hl_plant_n_streams (c->plant) > 0; k++)
        spoil (c, s, (Wrong) random_below (seed, "several", k, WRONG_MANY), seed, k + 1);
      /* A value missing here may make up for one too many there. */
      c->must_fail = FALSE;
    }
}

static double
processor_seconds (void)
{
  struct timespec now;
  clock_gettime (CLOCK_THREAD_CPUTIME_ID, &now);
  return (double) now.tv_sec + 1e-9 * (double) now.tv_nsec;
}

typedef struct { guint n[N_WRONGS], n_errors[N_WRONGS], n_sound[N_WRONGS], n_refused[N_WRONGS], n_failed; double seconds; } Log;

static void
fail (Log *log, const Case *c, guint32 seed, Wrong wrong, const char *why)
{
  g_autofree char *name = g_strdup_printf ("random-invalid-%u.heatloom", seed), *path = g_build_filename (g_get_tmp_dir (), name, NULL);
  hl_plant_save (c->plant, path, NULL);
  g_test_message ("FAILED seed %u, %s:%s: %s; plant: %s", seed, names[wrong], c->text, why, path);
  log->n_failed++;
}

/* What the engine says of it, cold and from the sound plant's answer. */
static void
judge (Log *log, const Case *c, const HlSolution *sound, guint32 seed, Wrong wrong)
{
  for (int warm = 0; warm < 2; warm++)
    {
      double begin = processor_seconds ();
      g_autoptr (HlSolution) s = hl_solve (c->plant, warm ? sound : NULL);
      g_autoptr (HlPlant) settled = warm ? hl_settle (c->plant, NULL, NULL) : NULL;
      double seconds = processor_seconds () - begin;
      g_autofree char *summary = hl_solution_summary (s);
      log->seconds = fmax (log->seconds, seconds);
      if (seconds > SECONDS)
        {
          g_autofree char *why = g_strdup_printf ("took %.2f s", seconds);
          fail (log, c, seed, wrong, why);
          return;
        }
      if (!hl_solution_is_solved (s))
        {
          if (!hl_solution_has_grade (s, HL_GRADE_ERROR))
            fail (log, c, seed, wrong, "not solved, and no error says why");
          log->n_errors[wrong] += !warm;
          continue;
        }
      RandomCheck check = random_check (s);
      if (c->must_fail)
        fail (log, c, seed, wrong, "solved, although it cannot be");
      else if (!(check.mass < 2e-9 && check.energy < 2e-9 && check.given < 2e-8 && check.machine < 2e-8) || check.n_broken_laws > 0)
        fail (log, c, seed, wrong, check.text);
      log->n_sound[wrong] += !warm;
    }
}

static void
test_random_wrongs (void)
{
  Log log = { 0 };
  for (int k = 0; k < n_plants; k++)
    {
      guint32 seed = first_seed + (guint32) k;
      RandomDesign design = random_design (seed);
      Wrong wrong = (Wrong) (k % N_WRONGS);
      g_autofree char *text = random_plant_text (&design);
      Case c = { test_plant (text), FALSE, FALSE, "" };
      g_autoptr (HlSolution) sound = hl_solve (c.plant, NULL);
      if (hl_solution_is_solved (sound))
        {
          log.n[wrong]++;
          spoil (&c, sound, wrong, seed, 0);
          if (c.is_changed)
            judge (&log, &c, sound, seed, wrong);
          else
            log.n_refused[wrong]++;
        }
      hl_plant_unref (c.plant);
    }
  for (int wrong = 0; wrong < N_WRONGS; wrong++)
    g_test_message ("%s: %u plants, %u reported, %u left as they were, %u with a sound answer", names[wrong], log.n[wrong], log.n_errors[wrong],
                    log.n_refused[wrong], log.n_sound[wrong]);
  g_test_message ("seeds %u to %u: %u failed; longest %.3f s", first_seed, first_seed + (guint32) n_plants - 1, log.n_failed, log.seconds);
  g_assert_cmpuint (log.n_failed, ==, 0);
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
  g_test_add_func ("/engine/random/invalid", test_random_wrongs);
  return g_test_run ();
}
