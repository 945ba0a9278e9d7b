/* Files of liquids: one's own becomes a medium, a wrong one says what is wrong.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include <glib/gstdio.h>

#include "gas-check.h"

static const char good[] =
  "{ \"heatloom_liquid\": 1, \"id\": \"my-oil\", \"name\": \"My oil\", \"formulation\": \"straight lines\", \"source\": \"this test\",\n"
  "  \"range\": { \"T_min_K\": 280, \"T_max_K\": 500, \"p_max_Pa\": 1e6 }, \"density_kg_per_m3\": [900, -60], \"heat_capacity_J_per_kgK\": [1800, 300],\n"
  "  \"conductivity_W_per_mK\": [0.13], \"ln_viscosity_Pas\": [-12, 3] }";

static const HlFluid *
load (const char *from, const char *to, GError **error)
{
  g_auto (GStrv) parts = g_strsplit (good, from, 2);
  g_autofree char *text = g_strjoinv (to, parts), *path = NULL;
  g_assert_cmpuint (g_strv_length (parts), ==, 2);
  int file = g_file_open_tmp ("liquid-XXXXXX.json", &path, NULL);
  g_assert_cmpint (file, >=, 0);
  g_close (file, NULL);
  g_assert_true (g_file_set_contents (path, text, -1, NULL));
  const HlFluid *fluid = hl_fluid_load_file (path, error);
  g_unlink (path);
  return fluid;
}

static void
test_own_file_becomes_a_medium (void)
{
  g_autoptr (GError) error = NULL;
  HlState state;
  const HlFluid *oil = load ("900", "900", &error);
  g_assert_no_error (error);
  g_assert_true (hl_fluid_lookup ("my-oil") == oil);
  g_auto (GStrv) ids = hl_fluid_list ();
  g_assert_true (g_strv_contains ((const char *const *) ids, "my-oil"));
  g_assert_cmpint (hl_fluid_state_pT (oil, 101325.0, 373.15, &state), ==, HL_OK);
  g_assert_cmpfloat_with_epsilon (1.0 / state.v, 840.0, 1e-9);
  g_assert_cmpfloat_with_epsilon (state.h, 1800.0 * 100.0 + 300.0 * 50.0, 1e-6);      /* by hand: the integral of cp */
  /* Read again the newer one answers; who holds the older one keeps it. */
  const HlFluid *newer = load ("900", "901", &error);
  g_assert_no_error (error);
  g_assert_true (newer != oil && hl_fluid_lookup ("my-oil") == newer);
  g_assert_cmpint (hl_fluid_state_pT (oil, 101325.0, 373.15, &state), ==, HL_OK);
  g_assert_cmpfloat_with_epsilon (1.0 / state.v, 840.0, 1e-9);
}

static void
test_refusals_say_why (void)
{
  static const struct { const char *from, *to, *says; } rows[] = {
    { "{ \"heatloom_liquid\"", "{{ \"heatloom_liquid\"", "no JSON" },
    { "_liquid\": 1", "_liquid\": 2", "\"heatloom_liquid\" is not 1; this program reads version 1 of the form" },
    { "my-oil", "My Oil", "id \"My Oil\" may have small letters, digits and - only" },
    { "my-oil", "mineral-oil", "id \"mineral-oil\" belongs to a medium of the program; choose another id" },
    { "my-oil", "isopentane", "id \"isopentane\" belongs to a medium of the program; choose another id" },
    { "my-oil", "air", "id \"air\" belongs to a medium of the program; choose another id" },
    { "\"name\": \"My oil\",", "", "\"name\" is missing or no text" },
    { "\"source\": \"this test\"", "\"source\": 5", "\"source\" is missing or no text" },
    { "\"T_max_K\": 500", "\"T_max_K\": 200", "range.T_min_K 280 is not below range.T_max_K 200" },
    { "\"T_max_K\": 500,", "", "range.T_max_K is missing or no number above 0" },
    { "[0.13]", "[]", "\"conductivity_W_per_mK\" has 0 numbers; 1 to 8 are allowed" },
    { "[0.13]", "[\"a\"]", "\"conductivity_W_per_mK\"[0] is no finite number" },
    { "[0.13]", "0.13", "\"conductivity_W_per_mK\" is missing or no list [ ... ]" },
    { "[900, -60]", "[50]", "at 280 K the density is 50; a liquid has 100 to 25000" },
    { "[900, -60]", "[900, -300, -300]", "the density bends too much" },
    { "[1800, 300]", "[-1800]", "at 280 K the heat capacity is -1800; a liquid has 100 to 20000" },
    { "[-12, 3]", "[12]", "at 280 K the viscosity is 162755; a liquid has 1e-06 to 10000" },
  };
  for (gsize i = 0; i < G_N_ELEMENTS (rows); i++)
    {
      g_autoptr (GError) error = NULL;
      g_assert_null (load (rows[i].from, rows[i].to, &error));
      g_assert_error (error, HL_FLUID_ERROR, HL_FLUID_ERROR_FILE);
      if (strstr (error->message, rows[i].says) == NULL || strstr (error->message, ".json: ") == NULL)
        g_error ("got \"%s\", expected \"%s\"", error->message, rows[i].says);
    }
}

int
main (int argc, char *argv[])
{
  g_test_init (&argc, &argv, NULL);
  g_test_add_func ("/fluid/liquid-read/own", test_own_file_becomes_a_medium);
  g_test_add_func ("/fluid/liquid-read/refusals", test_refusals_say_why);
  return g_test_run ();
}
