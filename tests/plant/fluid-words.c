/* Names of media can be translated, all of them.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "plant/fluid-words.h"
#include <string.h>

static void
test_every_medium_has_its_name_in_the_list (void)
{
  g_auto (GStrv) ids = hl_fluid_list ();
  for (guint k = 0; ids[k] != NULL; k++)
    if (!hl_words_know_fluid (hl_fluid_lookup (ids[k])))
      g_error ("%s: its name is not in src/plant/fluid-words.c", ids[k]);
}

static void
test_words (void)
{
  g_autofree char *isopentane = hl_words_of_safety (hl_fluid_lookup ("isopentane")), *toluene = hl_words_of_safety (hl_fluid_lookup ("toluene"));
  g_autofree char *benzene = hl_words_of_safety (hl_fluid_lookup ("benzene"));
  g_assert_cmpstr (isopentane, ==, "A3");
  g_assert_cmpstr (toluene, ==, "flammable");
  g_assert_nonnull (strstr (benzene, "toxic"));
  g_assert_cmpstr (hl_words_of_expansion (HL_EXPANSION_ISENTROPIC), ==, "isentropic");
  g_assert_cmpstr (hl_words_of_cycle (HL_CYCLE_POSSIBLE), ==, "");
  g_assert_cmpstr (hl_words_of_cycle (HL_CYCLE_NO_DOME), ==, "does not evaporate");
}

int
main (int argc, char **argv)
{
  g_test_init (&argc, &argv, NULL);
  g_test_add_func ("/plant/fluid-words/names", test_every_medium_has_its_name_in_the_list);
  g_test_add_func ("/plant/fluid-words/words", test_words);
  return g_test_run ();
}
