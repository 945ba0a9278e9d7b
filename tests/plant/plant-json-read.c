/* Reading: every refusal says where, what and how to mend.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "plant/tie-private.h"
#include "plant-test.h"

/* The loop with one piece of its text replaced. */
static char *
spoiled (const char *from, const char *to)
{
  GString *text = g_string_new (LOOP_TEXT);
  if (g_string_replace (text, from, to, 1) != 1)
    g_error ("“%s” is not in the text", from);
  return g_string_free (text, FALSE);
}

static void
test_refusals (void)
{
  static const struct { const char *from, *to; HlPlantError code; const char *says; } rows[] = {
    /* header */
    { "\"heatloom\": 1, ", "", HL_PLANT_ERROR_FOREIGN, "loop.heatloom: this is JSON, but no Heatloom plant" },
    { "\"heatloom\": 1", "\"heatloom\": \"1\"", HL_PLANT_ERROR_FOREIGN, "no Heatloom plant" },
    { "\"heatloom\": 1", "\"heatloom\": 2", HL_PLANT_ERROR_FOREIGN, "made by a later version of Heatloom; update the program" },
    { "\"heatloom\": 1", "\"heatloom\": 0", HL_PLANT_ERROR_FOREIGN, "must be 1" },
    { "\"title\": \"Loop “A”\"", "\"title\": 7", HL_PLANT_ERROR_CONTENT, "title: must be a text in quotes, not a number" },
    { "\"metric\"", "\"imperial\"", HL_PLANT_ERROR_CONTENT, "units: “imperial” is none of “metric”, “si”, “us”" },
    { "\"metric\"", "null", HL_PLANT_ERROR_CONTENT, "units: must be a text in quotes, not null" },
    { "\"if97\"", "\"magic\"", HL_PLANT_ERROR_CONTENT, "formulation: “magic” is not known; write \"if97\" or \"iapws95\"" },
    { "\"altitude\": 60", "\"altitude\": 60000", HL_PLANT_ERROR_OUT_OF_RANGE, "site.altitude: 60000 lies outside -1000 to 11000" },
    { "\"altitude\": 60", "\"altitude\": \"high\"", HL_PLANT_ERROR_CONTENT, "site.altitude: must be a number in the SI unit, not a text" },
    { "\"dead_p\": 101325", "\"dead_p\": 0", HL_PLANT_ERROR_OUT_OF_RANGE, "site.dead_p" },
    { "\"ambient_T\": 288.15", "\"ambient_T\": 15", HL_PLANT_ERROR_OUT_OF_RANGE, "site.ambient_T: 15 lies outside" },
    { "\"components\": [\n", "\"components\": {}, \"old\": [\n", HL_PLANT_ERROR_CONTENT, "components: must be a list in [ ], not an object" },
    { "\"streams\": [\n", "\"streams\": true, \"old\": [\n", HL_PLANT_ERROR_CONTENT, "streams: must be a list in [ ], not true or false" },
    { "\"plant\": {\"given\"", "\"plant\": [], \"old\": {\"given\"", HL_PLANT_ERROR_CONTENT, "plant: must be an object in { }, not a list" },
    /* components: line, item and id stand in front */
    { "{\"id\": \"G1\", \"kind\": \"generator\", \"at\": [26, 8]}", "7", HL_PLANT_ERROR_CONTENT, "loop.heatloom:6: components[2]: must be an object in { }, not a number" },
    { "\"id\": \"G1\", ", "", HL_PLANT_ERROR_CONTENT, "components[2].id: is missing; every item needs one, for instance \"T1\"" },
    { "\"id\": \"G1\"", "\"id\": \"1G\"", HL_PLANT_ERROR_CONTENT, "components[2].id: “1G” is no id" },
    { "\"id\": \"G1\"", "\"id\": \"plant\"", HL_PLANT_ERROR_CONTENT, "“plant” is no id" },
    { "\"id\": \"G1\"", "\"id\": \"G 1\"", HL_PLANT_ERROR_CONTENT, "“G 1” is no id" },
    { "\"id\": \"G1\"", "\"id\": \"\"", HL_PLANT_ERROR_CONTENT, "“” is no id" },
    { "\"id\": \"G1\"", "\"id\": \"Gaaaaaaaaaaaaaaaaaaaaaaaaaaaaaaaaaaaaaaaaaa\"", HL_PLANT_ERROR_CONTENT, "is no id" },
    { "\"id\": \"G1\"", "\"id\": \"GGéééééééééééééééééééééééééééééééééééééééééé\"", HL_PLANT_ERROR_CONTENT, "“GGééééééééééééééééééééééééééééééééééééé…” is no id" },
    { "\"net_power\"", "\"nété\"", HL_PLANT_ERROR_CONTENT, "plant.given.nété: the plant has no quantity “nété”" },
    { "\"id\": \"G1\"", "\"id\": 5", HL_PLANT_ERROR_CONTENT, "components[2].id: must be a text" },
    { "\"id\": \"G1\"", "\"id\": \"T1\"", HL_PLANT_ERROR_CONTENT, "components[2].id: “T1” is already the id of an item of components; ids must be unique, so rename one" },
    { "\"kind\": \"generator\", ", "", HL_PLANT_ERROR_CONTENT, "components[2] \"G1\".kind: is missing; it is one of boiler, heat_input" },
    { "\"kind\": \"generator\"", "\"kind\": \"teapot\"", HL_PLANT_ERROR_CONTENT, "loop.heatloom:6: components[2] \"G1\".kind: “teapot” is not known; it is one of" },
    { "\"name\": \"boiler\"", "\"name\": []", HL_PLANT_ERROR_CONTENT, "components[0] \"B1\".name: must be a text" },
    { "[8, 12]", "[8]", HL_PLANT_ERROR_CONTENT, "components[0] \"B1\".at: must be two whole numbers" },
    { "[8, 12]", "[8, 12.5]", HL_PLANT_ERROR_CONTENT, "at: must be two whole numbers" },
    { "[8, 12]", "[8, 1e9]", HL_PLANT_ERROR_CONTENT, "at: must be two whole numbers" },
    { "[8, 12]", "8", HL_PLANT_ERROR_CONTENT, "at: must be two whole numbers" },
    { "\"turn\": 1", "\"turn\": 4", HL_PLANT_ERROR_CONTENT, "turn: must be a whole number from 0 to 3" },
    { "\"mirror\": true", "\"mirror\": 1", HL_PLANT_ERROR_CONTENT, "mirror: must be true or false, not a number" },
    { "\"extractions\": 1", "\"extractions\": 9", HL_PLANT_ERROR_CONTENT, "extractions: must be a whole number from 0 to 8" },
    { "\"extractions\": 1", "\"extractions\": 1.5", HL_PLANT_ERROR_CONTENT, "extractions: must be a whole number from 0 to 8" },
    { "\"straight line\"", "\"crooked line\"", HL_PLANT_ERROR_CONTENT, "expansion: “crooked line” is none of “by group”, “straight line”" },
    { "\"straight line\"", "1", HL_PLANT_ERROR_CONTENT, "expansion: must be a text" },
    /* values */
    { "\"given\": {\"steam.T\": 758.15}", "\"given\": [758.15]", HL_PLANT_ERROR_CONTENT, "components[0] \"B1\".given: must be an object in { }, not a list" },
    { "\"steam.T\": 758.15", "\"steam.q\": 758.15", HL_PLANT_ERROR_CONTENT, "components[0] \"B1\".given.steam.q: B1 (Fired boiler) has no quantity “steam.q”" },
    { "\"steam.T\": 758.15", "\"steam.T\": \"485 °C\"", HL_PLANT_ERROR_CONTENT, "given.steam.T: must be a number in K, not a text" },
    { "\"steam.T\": 758.15", "\"steam.T\": -5", HL_PLANT_ERROR_OUT_OF_RANGE, "B1.steam.T is -278.15 °C: the quantity “Steam temperature” must lie above absolute zero" },
    { "\"isentropic_efficiency\": 0.83", "\"isentropic_efficiency\": 1.4", HL_PLANT_ERROR_OUT_OF_RANGE, "loop.heatloom:5: components[1] \"T1\".assumed.isentropic_efficiency: T1.isentropic_efficiency is 1.4: the quantity “Isentropic efficiency” must lie above 0 and be at most 1" },
    { "\"isentropic_efficiency\": 0.83", "\"isentropic_efficiency\": \"x\"", HL_PLANT_ERROR_CONTENT, "must be a number in no unit, not a text" },
    { "\"isentropic_efficiency\": 0.83", "\"inlet.p\": 0.83", HL_PLANT_ERROR_CONTENT, "assumed.inlet.p: stands under “given” too; a quantity has one origin" },
    { "\"0.05*B1.steam.p+20000\"", "0.05", HL_PLANT_ERROR_CONTENT, "tied.extraction1.p: must be a tie as a text, for instance \"0.23*B1.steam.p\", not a number" },
    { "\"0.05*B1.steam.p+20000\"", "\"20000\"", HL_PLANT_ERROR_CONTENT, "“20000” names no other quantity; put a plain number under \"given\"" },
    { "\"0.05*B1.steam.p+20000\"", "\"0.05*Z9\"", HL_PLANT_ERROR_ADDRESS, "tied.extraction1.p: “Z9” names no quantity: write component.quantity" },
    { "\"0.05*B1.steam.p+20000\"", "\"T1.extraction1.p\"", HL_PLANT_ERROR_ADDRESS, "that is the same quantity" },
    { "\"0.05*B1.steam.p+20000\"", "\"m:2\"", HL_PLANT_ERROR_CONTENT, "tie like to like" },
    { "\"m\": \"0.9*m:2\"", "\"w\": \"0.9*m:2\"", HL_PLANT_ERROR_CONTENT, "streams[3] \"4\".tied.w: a stream has no quantity “w”; it has m, p, T, h, s, x and v" },
    { "\"net_power\": 12000000", "\"net_glory\": 12000000", HL_PLANT_ERROR_CONTENT, "loop.heatloom: plant.given.net_glory: the plant has no quantity “net_glory”" },
    { "\"net_power\": 12000000", "\"net_power\": 1e300", HL_PLANT_ERROR_OUT_OF_RANGE, "plant.given.net_power: plant.net_power is" },
    { "\"net_power\"", "\"aaaaaaaaaaaaaaaaaaaaaaaaaaaaaaaaaaaaaaaaaaaaaaaaaaaaaaaaaaaaaaaaaaaaaaaaaaaaaaaaaaaaaaaaaaaa\"", HL_PLANT_ERROR_CONTENT, "the plant has no quantity" },
    /* streams */
    { "\"from\": \"B1.steam\", ", "", HL_PLANT_ERROR_CONTENT, "loop.heatloom:12: streams[0] \"live\".from: must name a component and its port, for instance \"B1.steam\"" },
    { "\"from\": \"B1.steam\"", "\"from\": \"B1\"", HL_PLANT_ERROR_CONTENT, "from: must name a component and its port" },
    { "\"from\": \"B1.steam\"", "\"from\": 1", HL_PLANT_ERROR_CONTENT, "from: must be a text" },
    { "\"from\": \"B1.steam\"", "\"from\": \"Z9.steam\"", HL_PLANT_ERROR_CONTENT, "streams[0] \"live\": There is no component “Z9”" },
    { "\"to\": \"T1.inlet\"", "\"to\": \"T1.nozzle\"", HL_PLANT_ERROR_CONTENT, "T1 (Turbine section) has no port “nozzle”; it has inlet, extraction1, exhaust" },
    { "\"to\": \"T1.inlet\"", "\"to\": \"T1.exhaust\"", HL_PLANT_ERROR_CONTENT, "T1.exhaust is an outlet; a line ends at an inlet" },
    { "\"from\": \"B1.steam\"", "\"from\": \"B1.feed\"", HL_PLANT_ERROR_CONTENT, "B1.feed is an inlet; a line starts at an outlet" },
    { "\"to\": \"D1.steam\"", "\"to\": \"D1.inlet1\"", HL_PLANT_ERROR_CONTENT, "streams[4] \"5\".to: D1.inlet1 already has stream 4; a port holds one line, so put a splitter or a mixer there" },
    { "\"from\": \"C1.condensate\"", "\"from\": \"T1.exhaust\"", HL_PLANT_ERROR_CONTENT, "streams[2] \"3\".from: T1.exhaust already has stream 2" },
    { "\"to\": \"P2.inlet\"", "\"to\": \"D1.inlet1\"", HL_PLANT_ERROR_CONTENT, "cannot feed itself" },
    { "\"id\": \"live\"", "\"id\": \"T1\"", HL_PLANT_ERROR_CONTENT, "“T1” is already the id of an item of components" },
    { "\"id\": \"live\"", "\"id\": \"stream\"", HL_PLANT_ERROR_CONTENT, "“stream” is no id" },
    { "\"medium\": \"water\"", "\"medium\": \"whisky\"", HL_PLANT_ERROR_CONTENT, "medium: “whisky” is not a medium known here; heatloom-batch fluids lists them" },
    { "[[10, 8], [11, 8]]", "[[10, 8], [11]]", HL_PLANT_ERROR_CONTENT, "route: must be a list of bends, each [x, y]" },
    { "[[10, 8], [11, 8]]", "3", HL_PLANT_ERROR_CONTENT, "route: must be a list" },
    { "\"label\": [12, 6]", "\"label\": \"up\"", HL_PLANT_ERROR_CONTENT, "label: must be two whole numbers" },
    /* shafts */
    { "[\"T1\", \"G1\"]", "[]", HL_PLANT_ERROR_CONTENT, "loop.heatloom:20: shafts[0] \"S1\".joins: is missing or empty; list the components on the shaft" },
    { "[\"T1\", \"G1\"]", "[\"T1\", \"Z9\"]", HL_PLANT_ERROR_CONTENT, "joins: must name components of this plant; Z9 is none" },
    { "[\"T1\", \"G1\"]", "[\"T1\", 7]", HL_PLANT_ERROR_CONTENT, "joins: must name components of this plant; a number is none" },
    { "[\"T1\", \"G1\"]", "[\"T1\", \"C1\"]", HL_PLANT_ERROR_CONTENT, "C1 (Condenser) has no shaft; turbines, pumps and generators have" },
    { "[\"T1\", \"G1\"]", "[\"T1\", \"T1\"]", HL_PLANT_ERROR_CONTENT, "T1 is already on shaft S1" },
    { "[\"T1\", \"G1\"], \"colour\": 3}", "[\"T1\"]}, {\"id\": \"S1\", \"joins\": [\"G1\"]}", HL_PLANT_ERROR_CONTENT, "“S1” is already the id of an item of shafts" },
    /* syntax: line and column */
    { "\"kind\": \"boiler\",", "\"kind\": \"boiler\"", HL_PLANT_ERROR_SYNTAX, "loop.heatloom:4:33: a comma or } must stand here, not “\"”" },
    { "\"turn\": 1", "\"turn\": 01", HL_PLANT_ERROR_SYNTAX, "loop.heatloom:5:" },
    { "\"id\": \"G1\"", "\"id\": \"G1\", \"id\": \"G2\"", HL_PLANT_ERROR_SYNTAX, "the key “id” stands twice in one object; remove one" },
  };
  for (gsize i = 0; i < G_N_ELEMENTS (rows); i++)
    {
      g_autofree char *text = spoiled (rows[i].from, rows[i].to);
      GError *error = NULL;
      g_autoptr (HlPlant) plant = hl_plant_from_json (text, -1, "loop.heatloom", &error);
      if (plant != NULL)
        g_error ("“%s” was taken", rows[i].to);
      if (!g_error_matches (error, HL_PLANT_ERROR, (int) rows[i].code))
        g_error ("“%s”: code %d: %s", rows[i].to, error->code, error->message);
      assert_message (&error, rows[i].says);
    }
}

static void
test_too_much (void)
{
  g_autoptr (GString) many = g_string_new ("{\"heatloom\": 1, \"components\": ["), name = g_string_new (NULL);
  g_autofree char *long_text = g_strnfill (2000, 'x'), *large = g_strnfill (17 * 1024 * 1024, ' '), *text = NULL;
  GError *error = NULL;
  for (int i = 0; i <= 20000; i++)
    g_string_append (many, i > 0 ? ",0" : "0");
  g_string_append (many, "]}");
  g_assert_null (hl_plant_from_json (many->str, -1, "a", &error));
  assert_message (&error, "components: has more than 20000 items");
  text = spoiled ("Loop", long_text);
  g_assert_null (hl_plant_from_json (text, -1, "a", &error));
  assert_message (&error, "title: is longer than 1000 bytes; shorten it");
  g_assert_null (hl_plant_from_json (large, -1, NULL, &error));
  g_assert_true (g_error_matches (error, HL_PLANT_ERROR, HL_PLANT_ERROR_FILE));
  assert_message (&error, "larger than 16 MiB");
}

static void
test_other_json_is_foreign (void)
{
  static const char *const texts[] = { "[]", "7", "\"heatloom\"", "null", "{}", "{\"components\": []}" };
  for (gsize i = 0; i < G_N_ELEMENTS (texts); i++)
    {
      GError *error = NULL;
      g_assert_null (hl_plant_from_json (texts[i], -1, "a.json", &error));
      g_assert_true (g_error_matches (error, HL_PLANT_ERROR, HL_PLANT_ERROR_FOREIGN));
      assert_message (&error, "a.json: this is JSON, but no Heatloom plant");
    }
}

static void
test_the_least_that_is_a_plant (void)
{
  GError *error = NULL;
  g_autoptr (HlPlant) plant = hl_plant_from_json ("\xef\xbb\xbf{\"heatloom\": 1}", -1, "least", &error);
  g_assert_no_error (error);
  g_assert_cmpuint (hl_plant_n_components (plant), ==, 0);
  g_assert_cmpuint (hl_plant_n_assumed (plant), ==, 0);   /* a file says what is assumed; nothing is added in silence */
  g_assert_cmpint (hl_plant_units (plant), ==, HL_UNITS_METRIC);
}

/* Values may stand in any order and tie forward: they are read when everything is there. */
static void
test_what_is_read (void)
{
  g_autoptr (HlPlant) plant = loop_plant ();
  const HlComponent *turbine = hl_plant_find_component (plant, "T1");
  const HlStream *live = hl_plant_find_stream (plant, "live");
  g_assert_cmpint (turbine->turn, ==, 1);
  g_assert_true (turbine->is_mirrored);
  g_assert_cmpint (hl_component_option (turbine, "extractions"), ==, 1);
  g_assert_cmpint (hl_component_option (turbine, "expansion"), ==, 1);
  g_assert_true (json_object_has_member (turbine->extra, "maker"));
  g_assert_cmpuint (live->n_route, ==, 2);
  g_assert_cmpint (live->route[1].x, ==, 11);
  g_assert_true (live->has_label_place);
  g_assert_cmpint (live->label_y, ==, 6);
  g_assert_cmpstr (hl_values_find (&turbine->values, "extraction1.p")->tie->text, ==, "0.05*B1.steam.p+20000");
}

int
main (int argc, char **argv)
{
  g_test_init (&argc, &argv, NULL);
  g_test_add_func ("/plant-json-read/refusals", test_refusals);
  g_test_add_func ("/plant-json-read/too-much", test_too_much);
  g_test_add_func ("/plant-json-read/other-json-is-foreign", test_other_json_is_foreign);
  g_test_add_func ("/plant-json-read/the-least-that-is-a-plant", test_the_least_that_is_a_plant);
  g_test_add_func ("/plant-json-read/what-is-read", test_what_is_read);
  return g_test_run ();
}
