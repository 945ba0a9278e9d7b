/* Damaged coefficient files: always an error or a fluid whose calls end, never a crash.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include <string.h>

#include "fluid/helmholtz-private.h"

static guint n_fluids, n_errors;

/* Whatever the figures are, calls end with a status; what they give back need not be sound. */
static void
call_everything (const HlFluid *fluid, GRand *rand)
{
  for (int i = 0; i < 6; i++)
    {
      HlState state, back;
      HlSaturation sat;
      double T = g_rand_double_range (rand, fluid->limits.T_min, fluid->limits.T_max), p = fluid->limits.p_critical * g_rand_double_range (rand, 0.01, 3.0);
      if (hl_fluid_state_pT (fluid, p, T, &state) == HL_OK)
        {
          g_assert_cmpint (hl_fluid_state_ph (fluid, p, state.h, &back), <=, HL_NOT_CONVERGED);
          g_assert_cmpint (hl_fluid_state_ps (fluid, p, state.s, &back), <=, HL_NOT_CONVERGED);
          g_assert_cmpint (hl_fluid_state_hs (fluid, state.h, state.s, &back), <=, HL_NOT_CONVERGED);
        }
      g_assert_cmpint (hl_fluid_saturation_T (fluid, T, &sat), <=, HL_NOT_CONVERGED);
      g_assert_cmpint (hl_fluid_saturation_p (fluid, p, &sat), <=, HL_NOT_CONVERGED);
    }
}

static void
try (const char *text, gsize length, GRand *rand)
{
  g_autoptr (GError) error = NULL;
  HlHelmholtz *eq = hl_helmholtz_read (text, (gssize) length, "fuzz", &error);
  if (eq != NULL && hl_helmholtz_prepare (eq, "fuzz", &error))
    {
      g_assert_no_error (error);
      n_fluids++;
      call_everything (&eq->fluid, rand);
    }
  else
    {
      n_errors++;
      g_assert_error (error, HL_FLUID_ERROR, HL_FLUID_ERROR_FILE);
      g_assert_true (g_str_has_prefix (error->message, "fuzz: "));
      g_assert_true (g_utf8_validate (error->message, -1, NULL));
    }
  hl_helmholtz_free (eq);
}

static char *
good_file (const char *name, gsize *length)
{
  g_autofree char *path = g_test_build_filename (G_TEST_DIST, "..", "data", "fluids", name, NULL);
  g_autoptr (GError) error = NULL;
  char *text = NULL;
  if (!g_file_get_contents (path, &text, length, &error))
    g_error ("%s", error->message);
  return text;
}

static void
test_cut_short (void)
{
  gsize length;
  g_autofree char *text = good_file ("toluene.json", &length);
  g_autoptr (GRand) rand = g_rand_new_with_seed (1);
  n_fluids = 0;
  for (gsize end = 0; end + 3 < length; end += 7)
    try (text, end, rand);
  g_assert_cmpuint (n_fluids, ==, 0);
}

static void
test_changed_characters (void)
{
  static const char *const files[] = { "isopentane.json", "ammonia.json", "water-95.json", "r123.json" };
  static const char characters[] = "0123456789,.-e[]{}\"n ";
  g_autoptr (GRand) rand = g_rand_new_with_seed (2);
  n_fluids = n_errors = 0;
  for (gsize f = 0; f < G_N_ELEMENTS (files); f++)
    {
      gsize length;
      g_autofree char *text = good_file (files[f], &length);
      for (int i = 0; i < 120; i++)
        {
          g_autofree char *changed = g_strndup (text, length);
          for (int k = 0; k < 3; k++)
            {
              gint32 at = g_rand_int_range (rand, 0, (gint32) length);
              if (g_ascii_isdigit (changed[at]))
                changed[at] = (char) ('0' + g_rand_int_range (rand, 0, 10));
              else if (k == 0)
                changed[at] = characters[g_rand_int_range (rand, 0, (gint32) strlen (characters))];
            }
          try (changed, length, rand);
        }
    }
  /* Both ends were reached. */
  g_assert_cmpuint (n_fluids, >, 20);
  g_assert_cmpuint (n_errors, >, 20);
}

int
main (int argc, char *argv[])
{
  g_test_init (&argc, &argv, NULL);
  g_test_add_func ("/fuzz/fluid-file/cut-short", test_cut_short);
  g_test_add_func ("/fuzz/fluid-file/changed", test_changed_characters);
  return g_test_run ();
}
