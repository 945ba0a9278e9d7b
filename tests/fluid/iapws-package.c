/* Random states against Debian's python3-iapws, run beside; skipped where it is not installed.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "water-random.h"

#include <glib/gstdio.h>
#include <stdlib.h>
#include <string.h>

#define EXIT_MISSING 77

/* Double precision in two orders of summation: 1.1e-12 is known between this
 * package and compiled code (in w of region 1); 1e-10 leaves a margin for the
 * cancellation in cv. */
#define FORWARD 1e-10

/* The package ends its own iterations at 1.5e-8: absolute in T (Newton's
 * method at p), relative in its pairs of unknowns (T and density, T and x, T
 * and p).  Its properties inherit that with the sensitivity of each, a few
 * times that. */
#define INVERSE 1e-7

typedef struct { const char *pair; double a, b; HlState ours; double relative; } Row;

static void
add_row (GArray *rows, const char *pair, double a, double b, const HlState *ours, double relative)
{
  Row row = { pair, a, b, *ours, relative };
  g_array_append_val (rows, row);
}

/* Inverse calls of the same states.  Left out, as the package is known to be
 * off there: the mixture above 623.15 K (it answers with one phase of region 3
 * or with unpolished densities), and (h,s) near 100 MPa (it refuses). */
static void
add_single_phase (GArray *rows, GRand *rand, int region, int n)
{
  for (int i = 0; i < n; i++)
    {
      HlState state, inverse;
      double p, T;
      random_state (rand, region, &p, &T);
      p = fmax (p, 700.0);
      if (region_of (p, T) != region || fabs (T - 1073.15) < 0.2 || fabs (T - 623.15) < 0.2 || T < 273.5)
        continue;
      g_assert_cmpint (hl_fluid_state_pT (hl_fluid_water (), p, T, &state), ==, HL_OK);
      if (region == 3)
        add_row (rows, "dT", 1.0 / state.v, T, &state, FORWARD);
      else
        add_row (rows, "pT", p, T, &state, FORWARD);
      if (i % 4 != 0 || (region == 3 && (fabs (T - hl_if97_B23_T (p)) < 0.2 || fabs (p / HL_IF97_P_CRITICAL - 1.0) < 0.05)))
        continue;
      g_assert_cmpint (hl_fluid_state_ph (hl_fluid_water (), p, state.h, &inverse), ==, HL_OK);
      add_row (rows, "ph", p, state.h, &inverse, INVERSE);
      g_assert_cmpint (hl_fluid_state_ps (hl_fluid_water (), p, state.s, &inverse), ==, HL_OK);
      add_row (rows, "ps", p, state.s, &inverse, INVERSE);
      if (region == 2 && p < 80e6)
        {
          g_assert_cmpint (hl_fluid_state_hs (hl_fluid_water (), state.h, state.s, &inverse), ==, HL_OK);
          add_row (rows, "hs", state.h, state.s, &inverse, INVERSE);
        }
    }
}

static void
add_mixtures (GArray *rows, GRand *rand, int n)
{
  for (int i = 0; i < n; i++)
    {
      HlState state;
      double T = g_rand_double_range (rand, 274.0, 623.0), x = g_rand_double_range (rand, 0.01, 0.99);
      double p = hl_if97_psat (T);
      g_assert_cmpint (hl_fluid_state_Tx (hl_fluid_water (), T, x, &state), ==, HL_OK);
      add_row (rows, "Tx", T, x, &state, FORWARD);
      g_assert_cmpint (hl_fluid_state_px (hl_fluid_water (), p, x, &state), ==, HL_OK);
      add_row (rows, "px", p, x, &state, FORWARD);
      add_row (rows, "ph", p, state.h, &state, INVERSE);
      add_row (rows, "ps", p, state.s, &state, INVERSE);
    }
}

static char *
write_rows (const GArray *rows)
{
  g_autoptr (GError) error = NULL;
  g_autoptr (GString) text = g_string_new (NULL);
  char *path = NULL;
  for (guint i = 0; i < rows->len; i++)
    {
      const Row *row = &g_array_index (rows, Row, i);
      char a[G_ASCII_DTOSTR_BUF_SIZE], b[G_ASCII_DTOSTR_BUF_SIZE];
      g_string_append_printf (text, "%s %s %s\n", row->pair, g_ascii_dtostr (a, sizeof a, row->a), g_ascii_dtostr (b, sizeof b, row->b));
    }
  int file = g_file_open_tmp ("states-XXXXXX", &path, &error);
  g_assert_no_error (error);
  g_close (file, NULL);
  g_file_set_contents (path, text->str, -1, &error);
  g_assert_no_error (error);
  return path;
}

/* Worst differences of one pair, printed for the reader of the log. */
typedef struct { double worst; guint n; } Tally;

static void
compare_value (const Row *row, const char *what, double ours, double theirs, double floor, Tally *tally)
{
  if (isnan (theirs))
    return;
  double off = fabs (ours - theirs) / fmax (fabs (theirs), floor);
  tally->worst = fmax (tally->worst, off);
  if (!(off <= row->relative))
    g_error ("(%s) = (%.10g, %.10g): %s is %.12g, python3-iapws has %.12g, relative difference %.2g", row->pair, row->a, row->b,
             what, ours, theirs, off);
}

static void
compare_row (const Row *row, const char *line, Tally *tally)
{
  double v[9];
  char *rest = (char *) line;
  for (gsize i = 0; i < G_N_ELEMENTS (v); i++)
    v[i] = g_ascii_strtod (rest, &rest);
  tally->n++;
  compare_value (row, "p", row->ours.p, v[0], 0.0, tally);
  compare_value (row, "T", row->ours.T, v[1], 0.0, tally);
  compare_value (row, "h", row->ours.h, v[2], 1e3, tally);   /* h and s pass through zero at 273.16 K */
  compare_value (row, "s", row->ours.s, v[3], 10.0, tally);
  compare_value (row, "v", row->ours.v, v[4], 0.0, tally);
  compare_value (row, "cp", row->ours.cp, v[5], 0.0, tally);
  compare_value (row, "cv", row->ours.cv, v[6], 0.0, tally);
  compare_value (row, "w", row->ours.w, v[7], 0.0, tally);
  if (row->ours.phase == HL_PHASE_TWO_PHASE)
    compare_value (row, "x", row->ours.x, v[8], 0.01, tally);
}

static void
compare (const GArray *rows, char *output)
{
  static const char *pairs[] = { "pT", "dT", "ph", "ps", "hs", "px", "Tx" };
  Tally tallies[G_N_ELEMENTS (pairs)] = { 0 };
  g_auto (GStrv) lines = g_strsplit (g_strchomp (output), "\n", -1);
  guint n_refused = 0;
  g_assert_cmpuint (g_strv_length (lines), ==, rows->len);
  for (guint i = 0; i < rows->len; i++)
    {
      const Row *row = &g_array_index (rows, Row, i);
      gsize k = 0;
      while (!g_str_equal (pairs[k], row->pair))
        k++;
      if (g_str_equal (lines[i], "none"))
        n_refused++;
      else
        compare_row (row, lines[i], &tallies[k]);
    }
  for (gsize k = 0; k < G_N_ELEMENTS (pairs); k++)
    {
      g_test_message ("%s: %u states, largest relative difference %.2g", pairs[k], tallies[k].n, tallies[k].worst);
      g_assert_cmpuint (tallies[k].n, >, 10);
    }
  g_test_message ("%u states that python3-iapws refuses", n_refused);
  g_assert_cmpuint (n_refused, <, rows->len / 50);
}

static void
test_random_states_agree_with_python3_iapws (void)
{
  g_autoptr (GRand) rand = g_rand_new_with_seed (31);
  g_autoptr (GArray) rows = g_array_new (FALSE, FALSE, sizeof (Row));
  add_single_phase (rows, rand, 1, 300);
  add_single_phase (rows, rand, 2, 400);
  add_single_phase (rows, rand, 3, 300);
  add_single_phase (rows, rand, 5, 200);
  add_mixtures (rows, rand, 60);

  if (!g_file_test ("/usr/bin/python3", G_FILE_TEST_IS_EXECUTABLE))
    {
      g_test_skip ("/usr/bin/python3 is not installed");
      return;
    }
  g_autofree char *script = g_test_build_filename (G_TEST_DIST, "fluid", "iapws-package.py", NULL);
  g_autofree char *path = write_rows (rows);
  g_autofree char *output = NULL, *complaint = NULL;
  g_autoptr (GError) error = NULL;
  char *argv[] = { "/usr/bin/python3", script, path, NULL };
  int status = 0;
  g_spawn_sync (NULL, argv, NULL, G_SPAWN_DEFAULT, NULL, NULL, &output, &complaint, &status, &error);
  g_unlink (path);
  g_assert_no_error (error);
  if (WIFEXITED (status) && WEXITSTATUS (status) == EXIT_MISSING)
    {
      g_test_skip ("python3-iapws is not installed");
      return;
    }
  if (status != 0)
    g_error ("%s failed: %s", script, complaint);
  compare (rows, output);
}

int
main (int argc, char *argv[])
{
  g_test_init (&argc, &argv, NULL);
  g_test_add_func ("/fluid/iapws-package/random-states", test_random_states_agree_with_python3_iapws);
  return g_test_run ();
}
