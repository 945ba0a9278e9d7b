/* JSON text: strictness, bounds and places.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "plant/plant-private.h"
#include "plant-test.h"

static JsonNode *
parse (const char *text, gsize length, GError **error)
{
  g_autoptr (GHashTable) lines = g_hash_table_new_full (g_str_hash, g_str_equal, g_free, (GDestroyNotify) g_array_unref);
  HlJsonPlaces places = { "t", lines };
  return hl_json_parse (text, length, "t", &places, error);
}

static char *
rewrite (const char *text)
{
  GError *error = NULL;
  g_autoptr (JsonNode) node = parse (text, strlen (text), &error);
  GString *out = g_string_new (NULL);
  g_assert_no_error (error);
  hl_json_append_node (out, node);
  return g_string_free (out, FALSE);
}

/* RFC 8259. */
static void
test_valid_texts_come_back (void)
{
  static const struct { const char *text, *written; } rows[] = {
    { " {} ", "{}" }, { "[ ]", "[]" }, { "null", "null" }, { "true", "true" }, { "[false]", "[false]" },
    { "[0, -1, 12, 0.5, 1e5, 1E-2, -0.0]", "[0, -1, 12, 0.5, 100000, 0.01, -0]" },
    { "[9007199254740993, 1e300]", "[9007199254740992, 1e+300]" },
    { "{\"b\":1,\"a\":[{}]}", "{\"b\": 1, \"a\": [{}]}" },
    { "\"\\u00e9\\ud83d\\ude00\\n\\/\\b\"", "\"é😀\\n/\\u0008\"" },
    { "\"tab\\t quote\\\" back\\\\ \x7f\"", "\"tab\\t quote\\\" back\\\\ \x7f\"" },
    { "\r\n\t[1\n,2]\n", "[1, 2]" },
  };
  for (gsize i = 0; i < G_N_ELEMENTS (rows); i++)
    {
      g_autofree char *once = rewrite (rows[i].text), *twice = rewrite (once);
      g_assert_cmpstr (once, ==, rows[i].written);
      g_assert_cmpstr (twice, ==, once);
    }
}

static void
test_invalid_texts_are_refused (void)
{
  static const struct { const char *text, *says; } rows[] = {
    { "", "t:1:1: the file ends where a value must follow: it was cut short" },
    { "{", "where a text in double quotes must follow" },
    { "{\"a\"", "where a colon must follow" },
    { "{\"a\" 1}", "t:1:6: a colon must stand here, not “1”" },
    { "{\"a\":", "where a value must follow" },
    { "{\"a\":1", "where a comma or } must follow" },
    { "{\"a\":1,}", "a text in double quotes must stand here" },
    { "{a:1}", "a text in double quotes must stand here, not “a”" },
    { "{\"a\":1,\"a\":2}", "the key “a” stands twice" },
    { "[1,]", "a value must stand here" },
    { "[1 2]", "a comma or ] must stand here" },
    { "[1", "where a comma or ] must follow" },
    { "[\n1,\n x]", "t:3:2: a value must stand here, not “x”" },
    { "[1] 2", "something follows after the end of the plant; remove it" },
    { "// comment\n1", "a value must stand here" },
    { "01", "something follows after the end" },
    { "+1", "a value must stand here" },
    { "-", "where a value must follow" },
    { "-x", "a value must stand here" },
    { ".5", "a value must stand here" },
    { "1.", "where a digit must follow" },
    { "1.x", "a digit must stand here" },
    { "1e", "where a digit must follow" },
    { "1e+", "where a digit must follow" },
    { "1e999", "the number 1e999 is too large" },
    { "NaN", "a value must stand here" },
    { "Infinity", "a value must stand here" },
    { "tru", "a value must stand here" },
    { "'a'", "a value must stand here" },
    { "\"a", "where the rest of a text must follow" },
    { "\"a\\", "where the rest of a text must follow" },
    { "\"a\nb\"", "a quote is missing" },
    { "\"\\x\"", "an escape such as" },
    { "\"\\u12\"", "a hexadecimal digit" },
    { "\"\\u0000\"", "is no character of a text" },
    { "\"\\ud800\"", "low surrogate" },
    { "\"\\ud800\\u0041\"", "low surrogate" },
    { "\"\\udc00\"", "is no character of a text" },
    { "[\"\xc3\"]", "t:1: byte 2 is not UTF-8" },
    { "[1,\n2,\xff]", "t:2: byte 6 is not UTF-8" },
  };
  for (gsize i = 0; i < G_N_ELEMENTS (rows); i++)
    {
      GError *error = NULL;
      if (parse (rows[i].text, strlen (rows[i].text), &error) != NULL)
        g_error ("“%s” was taken", rows[i].text);
      g_assert_true (g_error_matches (error, HL_PLANT_ERROR, HL_PLANT_ERROR_SYNTAX));
      assert_message (&error, rows[i].says);
    }
  {
    GError *error = NULL;
    g_assert_null (parse ("[1,\0 2]", 7, &error));
    assert_message (&error, "byte 3 is not UTF-8");
  }
}

static void
test_bounds (void)
{
  g_autofree char *deep = g_strnfill (100000, '['), *long_text = g_strnfill (70000, 'x');
  g_autofree char *quoted = g_strconcat ("\"", long_text, "\"", NULL);
  g_autoptr (GString) nested = g_string_new (NULL), many = g_string_new ("[");
  GError *error = NULL;
  JsonNode *node;
  g_assert_null (parse (deep, strlen (deep), &error));
  assert_message (&error, "nested deeper than 64");
  g_assert_null (parse (quoted, strlen (quoted), &error));
  assert_message (&error, "a text is longer than 65536 bytes");
  for (int i = 0; i < 64; i++)
    g_string_append_c (nested, '[');
  for (int i = 0; i < 64; i++)
    g_string_append_c (nested, ']');
  node = parse (nested->str, nested->len, &error);
  g_assert_no_error (error);
  json_node_unref (node);
  for (int i = 0; i < 2000001; i++)
    g_string_append (many, "1,");
  g_assert_null (parse (many->str, many->len, &error));
  assert_message (&error, "more than 2000000 values");
}

static void
test_lines_of_items (void)
{
  static const char text[] = "{\"a\": [1,\n 2,\n\n 3], \"b\": {\"c\": [5]}, \"d\": []}";
  g_autoptr (GHashTable) lines = g_hash_table_new_full (g_str_hash, g_str_equal, g_free, (GDestroyNotify) g_array_unref);
  HlJsonPlaces places = { "t", lines };
  GError *error = NULL;
  g_autoptr (JsonNode) node = hl_json_parse (text, strlen (text), "t", &places, &error);
  g_assert_no_error (error);
  g_assert_nonnull (node);
  g_assert_cmpuint (hl_json_line (&places, "a", 0), ==, 1);
  g_assert_cmpuint (hl_json_line (&places, "a", 1), ==, 2);
  g_assert_cmpuint (hl_json_line (&places, "a", 2), ==, 4);
  g_assert_cmpuint (hl_json_line (&places, "a", 3), ==, 0);
  g_assert_cmpuint (hl_json_line (&places, "c", 0), ==, 0);
}

int
main (int argc, char **argv)
{
  g_test_init (&argc, &argv, NULL);
  g_test_add_func ("/json-text/valid-texts-come-back", test_valid_texts_come_back);
  g_test_add_func ("/json-text/invalid-texts-are-refused", test_invalid_texts_are_refused);
  g_test_add_func ("/json-text/bounds", test_bounds);
  g_test_add_func ("/json-text/lines-of-items", test_lines_of_items);
  return g_test_run ();
}
