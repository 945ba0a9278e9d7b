/* Dismissed findings: set and taken back, filed and read, forgotten with what they were about.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "plant/plant-private.h"
#include "plant-test.h"

static void
test_set_and_taken_back (void)
{
  g_autoptr (HlPlant) plant = loop_plant ();
  HlAddress wet = address (plant, "T1.exhaust_moisture"), whole = hl_address_component ("T1", "");
  g_autoptr (HlPlant) one = hl_plant_with_dismissed (plant, "exhaust-moisture", &wet, TRUE);
  g_autoptr (HlPlant) again = hl_plant_with_dismissed (one, "exhaust-moisture", &wet, TRUE);
  g_autoptr (HlPlant) two = hl_plant_with_dismissed (again, "leaving-velocity", &whole, TRUE);
  g_autoptr (HlPlant) back = hl_plant_with_dismissed (two, "exhaust-moisture", &wet, FALSE);
  g_autoptr (HlPlant) none = hl_plant_with_dismissed (back, "leaving-velocity", &whole, FALSE);
  g_assert_cmpuint (hl_plant_n_dismissed (plant), ==, 0);
  g_assert_cmpuint (hl_plant_n_dismissed (again), ==, 1);
  g_assert_true (hl_plant_is_dismissed (one, "exhaust-moisture", &wet));
  g_assert_false (hl_plant_is_dismissed (one, "exhaust-moisture", &whole));
  g_assert_false (hl_plant_is_dismissed (one, "leaving-velocity", &wet));
  g_assert_cmpuint (hl_plant_n_dismissed (two), ==, 2);
  g_assert_cmpstr (hl_plant_dismissed (back, 0)->code, ==, "leaving-velocity");
  g_assert_true (hl_plant_equal (one, again));
  g_assert_false (hl_plant_equal (one, plant));
  g_assert_true (hl_plant_equal (none, plant));
}

#define LIST " \"dismissed\": [\n" \
  "  {\"code\": \"exhaust-moisture\", \"at\": \"T1.exhaust_moisture\", \"why\": \"coated blades\"},\n" \
  "  {\"code\": \"negative-flow\", \"at\": \"m:2\"},\n  {\"code\": \"some-thing\", \"at\": \"T1\"},\n" \
  "  {\"code\": \"some-thing\", \"at\": \"stream:2\"},\n  {\"code\": \"some-thing\", \"at\": \"plant\"}],\n"

/* Takes @list in before the last member of the plant's file. */
static char *
with_list (const char *list)
{
  g_autoptr (GString) text = g_string_new (LOOP_TEXT);
  const char *at = strstr (text->str, " \"texts\"");
  g_string_insert (text, at - text->str, list);
  return g_string_free (g_steal_pointer (&text), FALSE);
}

static void
test_in_the_file (void)
{
  GError *error = NULL;
  g_autofree char *text = with_list (LIST);
  g_autoptr (HlPlant) plant = hl_plant_from_json (text, -1, "loop", &error);
  g_assert_no_error (error);
  g_assert_cmpuint (hl_plant_n_dismissed (plant), ==, 5);
  HlAddress flow = address (plant, "m:2"), stream = hl_address_stream ("2", ""), all = hl_address_plant ("");
  g_assert_true (hl_plant_is_dismissed (plant, "negative-flow", &flow));
  g_assert_true (hl_plant_is_dismissed (plant, "some-thing", &stream));
  g_assert_true (hl_plant_is_dismissed (plant, "some-thing", &all));
  g_autofree char *written = hl_plant_to_json (plant);
  g_autofree char *list = g_strndup (LIST, strlen (LIST) - 2);
  if (strstr (written, list) == NULL)
    g_error ("not written back:\n%s", written);
  g_autoptr (HlPlant) again = hl_plant_from_json (written, -1, "again", &error);
  g_assert_no_error (error);
  g_assert_true (hl_plant_equal (plant, again));
}

static void
test_refusals (void)
{
  static const struct { const char *list, *says; } rows[] = {
    { " \"dismissed\": {},\n", "dismissed: must be a list" },
    { " \"dismissed\": [3],\n", "dismissed[0]: must be an object in { }, not a number" },
    { " \"dismissed\": [{\"code\": \"a-b\", \"at\": \"T1\"}, {\"code\": \"a-b\"}],\n", "dismissed[1]: must say which finding is dismissed, and where" },
    { " \"dismissed\": [{\"code\": \"A b\", \"at\": \"T1\"}],\n", "dismissed[0]: must say which finding is dismissed, and where" },
    { " \"dismissed\": [{\"code\": 1, \"at\": \"T1\"}],\n", "code: must be a text" },
    { " \"dismissed\": [{\"code\": \"a-b\", \"at\": \"T 1\"}],\n", "dismissed[0]: “T 1” is no id" },
    { " \"dismissed\": [{\"code\": \"a-b\", \"at\": \"T1.\"}],\n", "dismissed[0]: “T1.” names no quantity" },
  };
  for (gsize i = 0; i < G_N_ELEMENTS (rows); i++)
    {
      GError *error = NULL;
      g_autofree char *text = with_list (rows[i].list);
      if (hl_plant_from_json (text, -1, "loop", &error) != NULL)
        g_error ("%s was taken", rows[i].list);
      assert_message (&error, rows[i].says);
    }
}

static void
test_follow_what_they_are_about (void)
{
  const char *turbine[] = { "T1", NULL };
  g_autofree char *text = with_list (LIST);
  g_autoptr (HlPlant) plant = hl_plant_from_json (text, -1, "loop", NULL);
  g_autoptr (HlPlant) without = hl_plant_without (plant, turbine), renamed = hl_plant_with_id (plant, "T1", "HP", NULL);
  HlAddress wet = hl_address_component ("HP", "exhaust_moisture");
  /* The turbine, and its exhaust line with it. */
  g_assert_cmpuint (hl_plant_n_dismissed (without), ==, 1);
  g_assert_cmpuint (hl_plant_n_dismissed (plant), ==, 5);
  g_assert_true (hl_plant_is_dismissed (renamed, "exhaust-moisture", &wet));
  g_assert_cmpuint (hl_plant_n_dismissed (renamed), ==, 5);
}

int
main (int argc, char **argv)
{
  g_test_init (&argc, &argv, NULL);
  g_test_add_func ("/dismissals/set-and-taken-back", test_set_and_taken_back);
  g_test_add_func ("/dismissals/in-the-file", test_in_the_file);
  g_test_add_func ("/dismissals/refusals", test_refusals);
  g_test_add_func ("/dismissals/follow-what-they-are-about", test_follow_what_they_are_about);
  return g_test_run ();
}
