/* The JSON writer against json-glib's reader.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "batch/json-text.h"

#include <json-glib/json-glib.h>
#include <math.h>

static void
test_what_is_written_reads_back (void)
{
  g_autoptr(GError) error = NULL;
  HlJsonText *json = hl_json_text_new ();
  hl_json_text_begin (json, NULL, '{', FALSE);
  hl_json_text_number (json, "third", 1.0 / 3.0);
  hl_json_text_number (json, "unknown", NAN);
  hl_json_text_number (json, "endless", INFINITY);
  hl_json_text_string (json, "words", "\"q\" \\ \n \t \x01 °C");
  hl_json_text_boolean (json, "yes", TRUE);
  hl_json_text_begin (json, "empty", '[', FALSE);
  hl_json_text_end (json);
  hl_json_text_begin (json, "list", '[', TRUE);
  hl_json_text_number (json, NULL, 1.0);
  hl_json_text_begin (json, NULL, '{', FALSE);
  hl_json_text_string (json, "a", "");
  hl_json_text_end (json);
  hl_json_text_end (json);
  hl_json_text_end (json);
  g_autofree char *text = hl_json_text_finish (json);

  g_autoptr(JsonParser) parser = json_parser_new_immutable ();
  json_parser_load_from_data (parser, text, -1, &error);
  g_assert_no_error (error);
  JsonObject *object = json_node_get_object (json_parser_get_root (parser));
  g_assert_cmpfloat (json_object_get_double_member (object, "third"), ==, 1.0 / 3.0);
  g_assert_true (json_object_get_null_member (object, "unknown"));
  g_assert_true (json_object_get_null_member (object, "endless"));
  g_assert_cmpstr (json_object_get_string_member (object, "words"), ==, "\"q\" \\ \n \t \x01 °C");
  g_assert_true (json_object_get_boolean_member (object, "yes"));
  g_assert_cmpuint (json_array_get_length (json_object_get_array_member (object, "empty")), ==, 0);
  g_assert_cmpuint (json_array_get_length (json_object_get_array_member (object, "list")), ==, 2);
}

static void
test_layout_is_one_member_a_line (void)
{
  HlJsonText *json = hl_json_text_new ();
  hl_json_text_begin (json, NULL, '{', FALSE);
  hl_json_text_begin (json, "1", '{', TRUE);
  hl_json_text_number (json, "p_Pa", 8e6);
  hl_json_text_number (json, "x", NAN);
  hl_json_text_end (json);
  hl_json_text_boolean (json, "solved", FALSE);
  hl_json_text_end (json);
  g_autofree char *text = hl_json_text_finish (json);
  g_assert_cmpstr (text, ==, "{\n  \"1\": {\"p_Pa\": 8000000, \"x\": null},\n  \"solved\": false\n}\n");
}

int
main (int argc, char **argv)
{
  g_test_init (&argc, &argv, NULL);
  g_test_add_func ("/json-text/what-is-written-reads-back", test_what_is_written_reads_back);
  g_test_add_func ("/json-text/layout-is-one-member-a-line", test_layout_is_one_member_a_line);
  return g_test_run ();
}
