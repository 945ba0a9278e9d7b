/* Coefficient files: what a wrong one is told, and that a right one of the user's own becomes a medium.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include <glib/gstdio.h>

#include "fluid/helmholtz-private.h"
#include "media.h"

static char *
good_file (void)
{
  g_autofree char *path = g_test_build_filename (G_TEST_DIST, "..", "data", "fluids", "isopentane.json", NULL);
  g_autoptr (GError) error = NULL;
  char *text = NULL;
  if (!g_file_get_contents (path, &text, NULL, &error))
    g_error ("%s", error->message);
  return text;
}

static char *
replaced (const char *text, const char *from, const char *to)
{
  const char *at = strstr (text, from);
  if (at == NULL)
    g_error ("\"%s\" is not in the file", from);
  return g_strdup_printf ("%.*s%s%s", (int) (at - text), text, to, at + strlen (from));
}

/* One mistake each; the message names place and mend. */
static void
test_wrong_files_are_refused (void)
{
  static const struct { const char *from, *to, *words; } rows[] = {
    { "{", "[", "this is no JSON" },
    { "\"heatloom_fluid\": 1,", "", "heatloom_fluid is missing" },
    { "\"heatloom_fluid\": 1", "\"heatloom_fluid\": 2", "this program reads version 1" },
    { "\"id\": \"isopentane\"", "\"id\": \"Iso Pentane\"", "small letters a-z, digits and -" },
    { "\"name\": \"Isopentane\",", "", "\"name\" is missing" },
    { "[\"R601a\"]", "[5]", "aliases[0] is no text" },
    { "0.07214878", "72.14878", "is it in g/mol?" },
    { "8.314472", "8314.472", "close to 8.314" },
    { "\"T_max_K\": 500", "\"T_max_K\": 450", "must reach beyond the critical point" },
    { "\"T_max_K\": 500", "\"T_max_K\": 100", "range.T_max_K is 100; it must be a finite number above 112.65" },
    { "\"p_max_Pa\": 1000000000", "\"p_max_Pa\": \"high\"", "range.p_max_Pa is missing or no number" },
    { "\"kind\": \"lead\"", "\"kind\": \"leed\"", "ideal[0].unknown kind \"leed\"; known are lead" },
    { "\"kind\": \"lead\"", "\"kind\": \"offset\"", "exactly one is needed, it stands for ln(delta)" },
    { "\"kind\": \"power\"", "\"kind\": \"powder\"", "residual[0].unknown kind \"powder\"; known are power" },
    { "\"d\": [1, 1, 1,", "\"d\": [1, 1,", "residual[0].\"d\" has 11 numbers but \"n\" has 12" },
    { "\"l\": [0, 0", "\"l\": [0.5, 0", "whole numbers from 0 to 16" },
    { "[1.0963, -3.0402", "[1.0963, true", "residual[0].\"n\"[1] is no finite number" },
    { "{ \"T_K\": 543.15", "{ \"T_K\": \"hot\"", "stable_to.T_K is missing or no number" },
    { "\"form\": \"linear\"", "\"form\": \"line\"", "saturation_start.rho_liquid.form is \"line\"; known are linear" },
    /* Figures that read well and cannot be right. */
    { "\"a\": 3 }", "\"a\": -30 }", "no positive heat capacity" },
    { "[1.0963, -3.0402", "[1.0963, 3.0402", "has no critical point near 460.35 K" },
    { "\"n\": [1.90090139367392", "\"n\": [-0.9", "no equilibrium of liquid and vapour at 112.65 K" },
  };
  g_autofree char *good = good_file ();
  for (gsize i = 0; i < G_N_ELEMENTS (rows); i++)
    {
      g_autofree char *wrong = replaced (good, rows[i].from, rows[i].to);
      g_autoptr (GError) error = NULL;
      HlHelmholtz *eq = hl_helmholtz_read (wrong, -1, "mine.json", &error);
      if (eq != NULL && hl_helmholtz_prepare (eq, "mine.json", &error))
        g_error ("row %" G_GSIZE_FORMAT " was taken: %s", i, rows[i].to);
      hl_helmholtz_free (eq);
      g_assert_error (error, HL_FLUID_ERROR, HL_FLUID_ERROR_FILE);
      if (!g_str_has_prefix (error->message, "mine.json: ") || strstr (error->message, rows[i].words) == NULL)
        g_error ("\"%s\" does not say \"%s\"", error->message, rows[i].words);
    }
}

static char *
write_file (const char *text)
{
  g_autoptr (GError) error = NULL;
  char *path = NULL;
  int fd = g_file_open_tmp ("heatloom-fluid-XXXXXX.json", &path, &error);
  g_assert_no_error (error);
  g_close (fd, NULL);
  g_file_set_contents (path, text, -1, &error);
  g_assert_no_error (error);
  return path;
}

static void
test_own_file_becomes_a_medium (void)
{
  g_autofree char *good = good_file (), *mine = replaced (good, "\"id\": \"isopentane\"", "\"id\": \"my-pentane\"");
  g_autofree char *path = write_file (mine);
  g_autoptr (GError) error = NULL;
  HlState ours, theirs;
  g_assert_null (hl_fluid_lookup ("my-pentane"));
  const HlFluid *fluid = hl_fluid_load_file (path, &error);
  g_assert_no_error (error);
  g_assert_true (hl_fluid_lookup ("my-pentane") == fluid);
  g_auto (GStrv) ids = hl_fluid_list ();
  g_assert_true (g_strv_contains ((const char *const *) ids, "my-pentane"));
  g_assert_cmpint (hl_fluid_state_ph (fluid, 5e5, 1e5, &ours), ==, HL_OK);
  g_assert_cmpint (hl_fluid_state_ph (hl_fluid_lookup ("isopentane"), 5e5, 1e5, &theirs), ==, HL_OK);
  g_assert_cmpfloat (ours.T, ==, theirs.T);

  /* Read again the newer one answers; who holds the older one keeps it. */
  const HlFluid *newer = hl_fluid_load_file (path, &error);
  g_assert_no_error (error);
  g_assert_true (newer != fluid && hl_fluid_lookup ("my-pentane") == newer);
  g_assert_cmpint (hl_fluid_state_ph (fluid, 5e5, 1e5, &ours), ==, HL_OK);
  g_unlink (path);
}

/* Published critical points lie a little beside the equation's; the dome must close on the equation. */
static void
test_critical_point_is_that_of_the_equation (void)
{
  g_autofree char *good = good_file ();
  g_autofree char *published = replaced (good, "\"critical\": { \"T_K\": 460.3497947114459, \"p_Pa\": 3378217.2241799296, \"rho_mol_per_m3\": 3270.98354399436 }",
                                         "\"critical\": { \"T_K\": 460.35, \"p_Pa\": 3378000.0, \"rho_mol_per_m3\": 3271.0 }");
  g_autoptr (GError) error = NULL;
  HlHelmholtz *eq = hl_helmholtz_read (published, -1, "mine.json", &error);
  g_assert_no_error (error);
  g_assert_true (hl_helmholtz_prepare (eq, "mine.json", &error));
  g_assert_no_error (error);
  g_assert_cmpfloat_with_epsilon (eq->Tc / 460.3497947114459, 1.0, 1e-9);
  g_assert_cmpfloat_with_epsilon (eq->pc / 3378217.2241799296, 1.0, 1e-8);
  hl_helmholtz_free (eq);
}

static void
test_files_that_cannot_be_taken (void)
{
  g_autofree char *good = good_file ();
  g_autofree char *path = write_file (good);
  g_autoptr (GError) taken = NULL, missing = NULL;
  g_assert_null (hl_fluid_load_file (path, &taken));
  g_assert_error (taken, HL_FLUID_ERROR, HL_FLUID_ERROR_FILE);
  g_assert_nonnull (strstr (taken->message, "id \"isopentane\" belongs to a medium of the program; choose another id"));
  g_unlink (path);
  g_assert_null (hl_fluid_load_file (path, &missing));
  g_assert_error (missing, G_FILE_ERROR, G_FILE_ERROR_NOENT);
}

int
main (int argc, char *argv[])
{
  g_test_init (&argc, &argv, NULL);
  g_test_add_func ("/fluid/helmholtz-read/refused", test_wrong_files_are_refused);
  g_test_add_func ("/fluid/helmholtz-read/own-file", test_own_file_becomes_a_medium);
  g_test_add_func ("/fluid/helmholtz-read/critical", test_critical_point_is_that_of_the_equation);
  g_test_add_func ("/fluid/helmholtz-read/cannot-be-taken", test_files_that_cannot_be_taken);
  return g_test_run ();
}
