/* Damaged plant files: always an error or a plant that can be written and read again, never a crash.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "../plant/plant-test.h"
#include "plant/document.h"

static guint n_plants, n_errors;

static void
try (const char *text, gsize length)
{
  GError *error = NULL;
  g_autoptr (HlDocument) document = hl_document_from_json (text, (gssize) length, "fuzz", &error), again = NULL;
  g_autofree char *written = NULL;
  if (document == NULL)
    {
      n_errors++;
      g_assert_nonnull (error);
      g_assert_true (error->domain == HL_PLANT_ERROR);
      g_assert_cmpuint (strlen (error->message), >, 10);
      g_assert_true (g_utf8_validate (error->message, -1, NULL));
      g_error_free (error);
      return;
    }
  n_plants++;
  g_assert_no_error (error);
  written = hl_document_to_json (document);
  again = hl_document_from_json (written, -1, "again", &error);
  g_assert_no_error (error);
  g_assert_true (hl_document_equal (document, again));
  for (int variant = 0; variant < (int) hl_document_n_variants (document); variant++)     /* whatever its changes say, there is a plant */
    {
      g_autoptr (GPtrArray) changes = hl_changes_between (hl_document_plant (document, HL_DOCUMENT_BASE), hl_document_plant (document, variant));
      g_autoptr (HlPlant) plant = hl_changes_apply (changes, hl_document_plant (document, HL_DOCUMENT_BASE), NULL);
      g_autoptr (GPtrArray) none = hl_changes_between (plant, hl_document_plant (document, variant));
      g_assert_cmpuint (none->len, ==, 0);
    }
}

static void
test_cut_short_at_every_byte (void)
{
  gsize whole = strlen (LOOP_TEXT);
  n_plants = 0;
  for (gsize length = 0; length < whole; length++)
    try (LOOP_TEXT, length);
  /* only the line feed at the end may be missing */
  g_assert_cmpuint (n_plants, ==, 1);
}

static void
test_flipped_bytes (void)
{
  GRand *rand = g_rand_new_with_seed (1848);
  gsize whole = strlen (LOOP_TEXT);
  n_plants = n_errors = 0;
  for (int n = 0; n < 20000; n++)
    {
      g_autofree char *text = g_strdup (LOOP_TEXT);
      for (int flips = g_rand_int_range (rand, 1, 4); flips > 0; flips--)
        text[g_rand_int_range (rand, 0, (int) whole)] ^= (char) (1 << g_rand_int_range (rand, 0, 8));
      try (text, whole);
    }
  g_rand_free (rand);
  g_assert_cmpuint (n_errors, >, 10000);
  g_assert_cmpuint (n_plants, >, 500);   /* changes in free texts do no harm */
}

/* Pieces moved about, doubled and dropped: valid JSON more often than flipped bytes. */
static void
test_shuffled_pieces (void)
{
  static const char *const pieces[] = { "\"T1\"", "\"P1\"", "{}", "[]", "null", "-1", "0", "1e300", "\"\"", "\"water\"", "true", "\"pump\"", "\"turbine\"",
                                        "\"T1.inlet\"", "\"m:2\"", "\"1.1*m:2+3\"", "8", "9999999", "\"by group\"" };
  GRand *rand = g_rand_new_with_seed (1909);
  n_plants = n_errors = 0;
  for (int n = 0; n < 20000; n++)
    {
      g_autoptr (GString) text = g_string_new (LOOP_TEXT);
      /* replaces the value behind a random colon or comma */
      gsize at = (gsize) g_rand_int_range (rand, 0, (int) text->len), end;
      while (at < text->len && text->str[at] != ':' && text->str[at] != ',')
        at++;
      end = at + 1;
      while (end < text->len && strchr (",]}\n", text->str[end]) == NULL)
        end++;
      if (at >= text->len)
        continue;
      g_string_erase (text, (gssize) at + 1, (gssize) (end - at - 1));
      g_string_insert (text, (gssize) at + 1, pieces[g_rand_int_range (rand, 0, G_N_ELEMENTS (pieces))]);
      try (text->str, text->len);
    }
  g_rand_free (rand);
  g_assert_cmpuint (n_errors, >, 5000);
  g_assert_cmpuint (n_plants, >, 500);
}

int
main (int argc, char **argv)
{
  g_test_init (&argc, &argv, NULL);
  g_test_add_func ("/fuzz/plant-json/cut-short-at-every-byte", test_cut_short_at_every_byte);
  g_test_add_func ("/fuzz/plant-json/flipped-bytes", test_flipped_bytes);
  g_test_add_func ("/fuzz/plant-json/shuffled-pieces", test_shuffled_pieces);
  return g_test_run ();
}
