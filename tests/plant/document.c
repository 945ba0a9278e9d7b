/* Documents: variants as changes, their plants, their file, and what becomes of them when the base changes.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "plant/document.h"
#include "plant-test.h"
#include <glib/gstdio.h>
#include <unistd.h>

/* Variants of the loop with every kind of change, as the program writes them. */
#define VARIANTS_TEXT \
  ",\n \"variants\": [\n" \
  "  {\"name\": \"river cooling\", \"changes\": [\n" \
  "    {\"set\": \"plant.site.ambient_T\", \"to\": 300.5},\n" \
  "    {\"set\": \"C1.steam.p\", \"to\": 3360},\n" \
  "    {\"set\": \"T1.isentropic_efficiency\", \"to\": 0.8, \"origin\": \"assumed\"}]},\n" \
  "  {\"name\": \"no deaerator\", \"changes\": [\n" \
  "    {\"remove\": \"S1\"},\n" \
  "    {\"remove\": \"D1\"},\n" \
  "    {\"set\": \"T1.extractions\", \"to\": 0},\n" \
  "    {\"set\": \"T1.expansion\", \"to\": \"by group\"},\n" \
  "    {\"set\": \"B1.at\", \"to\": [9, 12]},\n" \
  "    {\"add\": {\"id\": \"V1\", \"kind\": \"valve\", \"name\": \"throttle\", \"at\": [12, 22], \"given\": {\"pressure_loss\": 0.1}}},\n" \
  "    {\"set\": \"stream:live.route\", \"to\": []},\n" \
  "    {\"add\": {\"id\": \"8\", \"from\": \"P1.outlet\", \"to\": \"V1.inlet\", \"medium\": \"water\"}},\n" \
  "    {\"add\": {\"id\": \"9\", \"from\": \"V1.outlet\", \"to\": \"P2.inlet\", \"medium\": \"water\", \"given\": {\"p\": 300000}}},\n" \
  "    {\"set\": \"P1.isentropic_efficiency\", \"to\": null, \"because\": \"to be found\"},\n" \
  "    {\"set\": \"P2.outlet.p\", \"to\": \"1.5*B1.steam.p\"}], \"by\": [\"E.M.\", 2]},\n" \
  "  {\"name\": \"as it is\", \"changes\": []}]}\n"

/* The loop's text without its own variants, then ours. */
static char *
document_text (void)
{
  const char *cut = strstr (LOOP_TEXT, ",\n \"variants\"");
  return g_strdup_printf ("%.*s%s", (int) (cut - LOOP_TEXT), LOOP_TEXT, VARIANTS_TEXT);
}

static HlDocument *
loop_document (void)
{
  g_autofree char *text = document_text ();
  GError *error = NULL;
  HlDocument *document = hl_document_from_json (text, -1, "loop.heatloom", &error);
  g_assert_no_error (error);
  return document;
}

static int
by_text (gconstpointer a, gconstpointer b)
{
  return strcmp (*(char *const *) a, *(char *const *) b);
}

/* The items of a plant in no particular order, to compare plants whose lists are ordered differently. */
static char *
content (const HlPlant *plant)
{
  g_autofree char *text = hl_plant_to_json (plant), *joined = NULL;
  g_auto (GStrv) lines = g_strsplit (text, "\n", -1);
  g_autoptr (GPtrArray) sorted = g_ptr_array_new ();
  for (guint i = 0; lines[i] != NULL; i++)
    {
      for (gsize n = strlen (lines[i]); n > 0 && strchr (",[]} ", lines[i][n - 1]) != NULL; n--)
        lines[i][n - 1] = '\0';
      if (*lines[i] != '\0')
        g_ptr_array_add (sorted, lines[i]);
    }
  g_ptr_array_sort (sorted, by_text);
  g_ptr_array_add (sorted, NULL);
  joined = g_strjoinv ("\n", (char **) sorted->pdata);
  return g_steal_pointer (&joined);
}

static void
assert_same_content (const HlPlant *a, const HlPlant *b)
{
  g_autofree char *first = content (a), *second = content (b);
  g_auto (GStrv) lines_a = g_strsplit (first, "\n", -1), lines_b = g_strsplit (second, "\n", -1);
  for (guint i = 0; lines_a[i] != NULL && lines_b[i] != NULL; i++)
    g_assert_cmpstr (lines_a[i], ==, lines_b[i]);
  g_assert_cmpuint (g_strv_length (lines_a), ==, g_strv_length (lines_b));
}

static double
value_at (const HlPlant *plant, const char *text)
{
  HlAddress where = address (plant, text);
  const HlValue *value = hl_plant_value_wherever (plant, &where, NULL);
  g_assert_nonnull (value);
  return value->value;
}

static void
test_text_is_written_as_read (void)
{
  g_autoptr (HlDocument) document = loop_document (), again = NULL;
  g_autofree char *text = document_text (), *written = hl_document_to_json (document);
  g_autofree char *path = g_build_filename (g_get_tmp_dir (), "heatloom-document-XXXXXX", NULL);
  GError *error = NULL;
  g_assert_cmpstr (written, ==, text);
  close (g_mkstemp (path));
  g_assert_true (hl_document_save (document, path, &error));
  again = hl_document_load (path, &error);
  g_assert_no_error (error);
  g_assert_true (hl_document_equal (document, again));
  g_unlink (path);
}

static void
test_plants_of_variants (void)
{
  g_autoptr (HlDocument) document = loop_document ();
  HlPlant *base = hl_document_plant (document, HL_DOCUMENT_BASE);
  HlPlant *river = hl_document_plant (document, hl_document_find_variant (document, "river cooling"));
  HlPlant *bare = hl_document_plant (document, hl_document_find_variant (document, "no deaerator"));
  HlAddress efficiency = address (base, "T1.isentropic_efficiency"), pump = address (base, "P1.isentropic_efficiency");
  HlAddress outlet = address (base, "P2.outlet.p");
  for (int i = 0; i < 3; i++)
    g_assert_cmpuint (hl_document_unapplied (document, i)->len, ==, 0);
  g_assert_cmpfloat (hl_plant_site (river)->ambient_T, ==, 300.5);
  g_assert_cmpfloat (hl_plant_site (base)->ambient_T, ==, 288.15);
  g_assert_cmpfloat (value_at (river, "C1.steam.p"), ==, 3360);
  g_assert_cmpint (hl_plant_value (river, &efficiency)->origin, ==, HL_ORIGIN_ASSUMED);
  g_assert_cmpfloat (value_at (river, "T1.isentropic_efficiency"), ==, 0.8);
  g_assert_null (hl_plant_find_component (bare, "D1"));
  g_assert_cmpuint (hl_plant_n_shafts (bare), ==, 0);
  g_assert_cmpint (hl_component_option (hl_plant_find_component (bare, "T1"), "extractions"), ==, 0);
  g_assert_cmpint (hl_plant_find_component (bare, "B1")->x, ==, 9);
  g_assert_cmpuint (hl_plant_find_stream (bare, "live")->n_route, ==, 0);
  g_assert_cmpstr (hl_plant_stream_at (bare, "V1", "outlet")->to_id, ==, "P2");
  g_assert_cmpfloat (value_at (bare, "p:9"), ==, 3e5);
  g_assert_null (hl_plant_value (bare, &pump));
  g_assert_cmpint (hl_plant_value (bare, &outlet)->origin, ==, HL_ORIGIN_TIED);
  g_assert_true (hl_document_plant (document, 2) == base);
  g_assert_true (hl_document_plant (document, 1) == bare);
}

/* An edit of the plant in view becomes changes of that variant, and of nothing else. */
static void
test_edits_go_to_the_variant_in_view (void)
{
  g_autoptr (HlDocument) document = loop_document (), edited = NULL;
  g_autoptr (HlPlant) warmer = with_given (hl_document_plant (document, 0), "C1.steam.p", 4000);
  g_autoptr (HlPlant) titled = hl_plant_with_title (warmer, "Loop B");
  edited = hl_document_with_plant (document, 0, titled);
  g_assert_cmpfloat (value_at (hl_document_plant (edited, 0), "C1.steam.p"), ==, 4000);
  g_assert_cmpfloat (value_at (hl_document_plant (document, 0), "C1.steam.p"), ==, 3360);
  g_assert_cmpuint (hl_document_changes (edited, 0)->len, ==, 3);
  g_assert_cmpstr (hl_plant_title (hl_document_plant (edited, HL_DOCUMENT_BASE)), ==, "Loop B");
  g_assert_cmpstr (hl_plant_title (hl_document_plant (edited, 1)), ==, "Loop B");
  assert_same_content (hl_document_plant (edited, 0), titled);
  g_assert_false (hl_document_equal (document, edited));
}

/* What the file says beside a change is still there after an edit of another value. */
static void
test_unknown_keys_of_changes_stay (void)
{
  g_autoptr (HlDocument) document = loop_document (), edited = NULL;
  g_autoptr (HlPlant) plant = with_given (hl_document_plant (document, 1), "T1.isentropic_efficiency", 0.9);
  g_autofree char *text = NULL;
  edited = hl_document_with_plant (document, 1, plant);
  text = hl_document_to_json (edited);
  g_assert_nonnull (strstr (text, "\"to\": null, \"because\": \"to be found\""));
  g_assert_nonnull (strstr (text, "\"by\": [\"E.M.\", 2]"));
}

static void
test_base_edits_reach_the_variants (void)
{
  g_autoptr (HlDocument) document = loop_document (), edited = NULL;
  g_autoptr (HlPlant) hotter = with_given (hl_document_plant (document, HL_DOCUMENT_BASE), "B1.steam.T", 800);
  edited = hl_document_with_plant (document, HL_DOCUMENT_BASE, hotter);
  g_assert_cmpfloat (value_at (hl_document_plant (edited, 0), "B1.steam.T"), ==, 800);
  g_assert_cmpfloat (value_at (hl_document_plant (edited, 0), "C1.steam.p"), ==, 3360);
}

/* A change that has lost its place is told and kept, also over an edit and a file, and holds again when its place is back. */
static void
test_changes_without_a_place_are_kept (void)
{
  static const char *const condenser[] = { "C1", NULL };
  g_autoptr (HlDocument) document = loop_document (), cut = NULL, edited = NULL, again = NULL, mended = NULL;
  HlPlant *base = hl_document_plant (document, HL_DOCUMENT_BASE);
  g_autoptr (HlPlant) without = hl_plant_without (base, condenser), other = NULL;
  g_autofree char *text = NULL;
  const HlUnapplied *unapplied;
  cut = hl_document_with_plant (document, HL_DOCUMENT_BASE, without);
  g_assert_cmpuint (hl_document_unapplied (cut, 0)->len, ==, 1);
  unapplied = hl_document_unapplied (cut, 0)->pdata[0];
  g_assert_cmpstr (hl_change_where (unapplied->change), ==, "C1.steam.p");
  g_assert_nonnull (strstr (unapplied->why, "there is no component “C1”"));
  g_assert_cmpfloat (value_at (hl_document_plant (cut, 0), "T1.isentropic_efficiency"), ==, 0.8);
  other = with_given (hl_document_plant (cut, 0), "T1.isentropic_efficiency", 0.7);
  edited = hl_document_with_plant (cut, 0, other);
  text = hl_document_to_json (edited);
  again = hl_document_from_json (text, -1, "again", NULL);
  mended = hl_document_with_plant (again, HL_DOCUMENT_BASE, base);
  g_assert_cmpuint (hl_document_unapplied (mended, 0)->len, ==, 0);
  g_assert_cmpfloat (value_at (hl_document_plant (mended, 0), "C1.steam.p"), ==, 3360);
  g_assert_cmpfloat (value_at (hl_document_plant (mended, 0), "T1.isentropic_efficiency"), ==, 0.7);
}

static void
test_names_and_order (void)
{
  g_autoptr (HlDocument) document = loop_document (), copied = NULL, moved = NULL, renamed = NULL, without = NULL, fresh = NULL;
  g_autofree char *free_name = hl_document_free_name (document, "river cooling");
  GError *error = NULL;
  g_assert_cmpstr (free_name, ==, "river cooling 2");
  g_assert_null (hl_document_with_variant (document, "river cooling", HL_DOCUMENT_BASE, &error));
  assert_message (&error, "there is a variant “river cooling” already");
  g_assert_null (hl_document_with_variant (document, " summer", HL_DOCUMENT_BASE, &error));
  assert_message (&error, "needs a name in one line");
  g_assert_null (hl_document_with_name (document, 0, "as it is", &error));
  assert_message (&error, "already");
  copied = hl_document_with_variant (document, "lake", 0, &error);
  g_assert_no_error (error);
  g_assert_cmpint (hl_document_find_variant (copied, "lake"), ==, 1);
  assert_same_content (hl_document_plant (copied, 1), hl_document_plant (document, 0));
  fresh = hl_document_with_variant (copied, "summer", HL_DOCUMENT_BASE, &error);
  g_assert_cmpint (hl_document_find_variant (fresh, "summer"), ==, 4);
  g_assert_true (hl_document_plant (fresh, 4) == hl_document_plant (fresh, HL_DOCUMENT_BASE));
  moved = hl_document_with_order (copied, 0, 3);
  g_assert_cmpstr (hl_document_variant_name (moved, 3), ==, "river cooling");
  g_assert_cmpstr (hl_document_variant_name (moved, 0), ==, "lake");
  renamed = hl_document_with_name (moved, 0, "lake", &error);
  g_assert_no_error (error);
  without = hl_document_without (renamed, 0);
  g_assert_cmpuint (hl_document_n_variants (without), ==, 3);
  g_assert_cmpint (hl_document_find_variant (without, "lake"), ==, HL_DOCUMENT_BASE);
  g_assert_cmpuint (hl_document_n_variants (document), ==, 3);
}

static void
test_promoted_variant_leaves_all_plants_alone (void)
{
  g_autoptr (HlDocument) document = loop_document (), promoted = NULL;
  promoted = hl_document_promoted (document, 1);
  g_assert_cmpuint (hl_document_n_variants (promoted), ==, 3);
  assert_same_content (hl_document_plant (promoted, HL_DOCUMENT_BASE), hl_document_plant (document, 1));
  g_assert_cmpstr (hl_document_variant_name (promoted, 1), ==, "former base");
  assert_same_content (hl_document_plant (promoted, 1), hl_document_plant (document, HL_DOCUMENT_BASE));
  assert_same_content (hl_document_plant (promoted, 0), hl_document_plant (document, 0));
  assert_same_content (hl_document_plant (promoted, 2), hl_document_plant (document, 2));
  for (int i = 0; i < 3; i++)
    g_assert_cmpuint (hl_document_unapplied (promoted, i)->len, ==, 0);
}

/* The base must not take an id that a variant has added or removed: the change would meet the wrong component. */
static void
test_ids_of_variants_are_not_given_out (void)
{
  g_autoptr (HlDocument) document = loop_document ();
  g_autofree char *valve = hl_plant_free_id (hl_document_plant (document, HL_DOCUMENT_BASE), "V");
  g_autofree char *stream = hl_plant_free_id (hl_document_plant (document, 0), "");
  g_autofree char *deaerator = hl_plant_free_id (hl_document_plant (document, 1), "D");
  g_assert_cmpstr (valve, ==, "V2");
  g_assert_cmpstr (stream, ==, "1");       /* the loop calls its first stream "live" */
  g_assert_cmpstr (deaerator, ==, "D2");
}

/* Any plant is reached from any other: all pairs among the examples, the loop, its variants and an empty plant.  Keys that the
 * program does not know stay with the item of that id, whatever becomes of it; so here there are none. */
static void
test_changes_lead_from_any_plant_to_any_other (void)
{
  static const char *const files[] = { "tallow-fen", "linden-row", "ferry-lane" };
  static const char *const unknown[] = { ", \"colour\": 3", ", \"paint\": \"green\"", ", \"wind\": \"west\"", ", \"maker\": {\"name\": \"unknown\", \"years\": [1, 2.5]}" };
  g_autofree char *all = document_text ();
  g_autoptr (GString) text = g_string_new (all);
  g_autoptr (HlDocument) document = NULL;
  g_autoptr (GPtrArray) plants = g_ptr_array_new_with_free_func ((GDestroyNotify) hl_plant_unref);
  for (guint i = 0; i < G_N_ELEMENTS (unknown); i++)
    g_assert_cmpuint (g_string_replace (text, unknown[i], "", 0), ==, 1);
  document = hl_document_from_json (text->str, -1, "loop", NULL);
  for (guint i = 0; i < G_N_ELEMENTS (files); i++)
    {
      g_autofree char *file = g_strconcat (files[i], ".heatloom", NULL);
      g_autofree char *path = g_build_filename (g_test_get_dir (G_TEST_DIST), "..", "data", "examples", file, NULL);
      GError *error = NULL;
      g_autoptr (HlDocument) example = hl_document_load (path, &error);
      g_assert_no_error (error);
      g_ptr_array_add (plants, hl_plant_ref (hl_document_plant (example, HL_DOCUMENT_BASE)));
    }
  for (int i = -1; i < 2; i++)
    g_ptr_array_add (plants, hl_plant_ref (hl_document_plant (document, i)));
  g_ptr_array_add (plants, hl_plant_new ());
  for (guint i = 0; i < plants->len; i++)
    for (guint j = 0; j < plants->len; j++)
      {
        g_autoptr (HlDocument) pair = hl_document_new (hl_plant_ref (plants->pdata[i])), two = NULL, with = NULL;
        two = hl_document_with_variant (pair, "other", HL_DOCUMENT_BASE, NULL);
        with = hl_document_with_plant (two, 0, plants->pdata[j]);
        g_assert_cmpuint (hl_document_unapplied (with, 0)->len, ==, 0);
        assert_same_content (hl_document_plant (with, 0), plants->pdata[j]);
        g_assert_cmpuint (hl_document_changes (with, 0)->len == 0, ==, i == j);
      }
}

/* Random values, let-gos, options and removals on top of each other. */
static void
test_random_edits_come_back_as_changes (void)
{
  GRand *rand = g_rand_new_with_seed (11);
  for (int round = 0; round < 60; round++)
    {
      g_autoptr (HlDocument) document = loop_document (), edited = NULL, read = NULL;
      g_autoptr (HlPlant) plant = hl_plant_ref (hl_document_plant (document, round % 2));
      g_autofree char *text = NULL;
      GError *error = NULL;
      for (int step = 0; step < 8; step++)
        {
          guint n = (guint) g_rand_int_range (rand, 0, (gint32) hl_plant_n_components (plant));
          const HlComponent *component = hl_plant_component (plant, n);
          guint n_quantities = hl_component_n_quantities (component);
          HlPlant *next = NULL;
          if (g_rand_int_range (rand, 0, 10) == 0)
            next = hl_plant_without (plant, (const char *const[]) { component->id, NULL });
          else if (g_rand_int_range (rand, 0, 4) == 0 && component->kind->n_options > 0)
            {
              const HlOptionKind *option = &component->kind->options[g_rand_int_range (rand, 0, (gint32) component->kind->n_options)];
              HlComponent *copy = hl_component_copy (component);
              hl_component_set_option (copy, option->key, g_rand_int_range (rand, option->least, option->most + 1));
              next = hl_plant_with_component (plant, copy);
            }
          else if (n_quantities > 0)
            {
              HlQuantity quantity = hl_component_quantity (component, (guint) g_rand_int_range (rand, 0, (gint32) n_quantities));
              HlAddress where = hl_address_component (component->id, quantity.key);
              HlValue value = { .origin = g_rand_boolean (rand) ? HL_ORIGIN_GIVEN : HL_ORIGIN_ASSUMED,
                                .value = g_rand_double_range (rand, MAX (quantity.kind->above, -10.0) + 1e-3, MIN (quantity.kind->at_most, 1e3)) };
              next = hl_plant_with_value (plant, &where, g_rand_int_range (rand, 0, 4) == 0 ? NULL : &value, NULL);
            }
          if (next == NULL)
            continue;
          hl_plant_unref (plant);
          plant = next;
          if (hl_plant_n_components (plant) == 0)
            break;
        }
      edited = hl_document_with_plant (document, round % 2, plant);
      g_assert_cmpuint (hl_document_unapplied (edited, round % 2)->len, ==, 0);
      assert_same_content (hl_document_plant (edited, round % 2), plant);
      text = hl_document_to_json (edited);
      read = hl_document_from_json (text, -1, "read", &error);
      g_assert_no_error (error);
      g_assert_true (hl_document_equal (read, edited));
      assert_same_content (hl_document_plant (read, round % 2), plant);
    }
  g_rand_free (rand);
}

static void
test_words_of_changes (void)
{
  g_autoptr (HlDocument) document = loop_document ();
  HlPlant *base = hl_document_plant (document, HL_DOCUMENT_BASE);
  static const struct { int variant; guint n; const char *words, *shown; gboolean is_look; } rows[] = {
    { 0, 0, "ambient temperature", "27.4 °C", FALSE }, { 0, 1, "condenser pressure of C1", "0.03360 bar", FALSE },
    { 0, 2, "isentropic efficiency of T1", "0.800", FALSE }, { 1, 0, "without S1", "", FALSE },
    { 1, 1, "without D1 (Open heater, deaerator)", "", FALSE }, { 1, 2, "T1: Extractions", "0", FALSE },
    { 1, 4, "place of B1 in the drawing", "", TRUE }, { 1, 5, "with V1 (throttle)", "", FALSE },
    { 1, 7, "with stream 8", "", FALSE }, { 1, 9, "isentropic efficiency of P1", "found", FALSE },
    { 1, 10, "outlet pressure of P2", "=1.5*B1.steam.p", FALSE },
  };
  for (guint i = 0; i < G_N_ELEMENTS (rows); i++)
    {
      HlPlant *plant = hl_document_plant (document, rows[i].variant);
      const HlChange *change = hl_document_changes (document, rows[i].variant)->pdata[rows[i].n];
      g_autofree char *words = hl_change_describe (change, base, plant), *shown = hl_change_shown (change, plant);
      g_assert_cmpstr (words, ==, rows[i].words);
      g_assert_cmpstr (shown, ==, rows[i].shown);
      g_assert_cmpint (hl_change_is_look (change), ==, rows[i].is_look);
    }
}

static void
test_refused_texts (void)
{
  static const struct { const char *variants, *says; } rows[] = {
    { "{}", "variants: must be a list in [ ], not an object" },
    { "[3]", "f:2: variants[0]: must be an object in { }, not a number" },
    { "[{}]", "f:2: variants[0].name: is missing" },
    { "[{\"name\": \"\"}]", "needs a name in one line" },
    { "[{\"name\": \"a\"}, {\"name\": \"a\"}]", "variants[1] \"a\".name: another variant has this name already" },
    { "[{\"name\": \"a\", \"changes\": 1}]", "variants[0] \"a\".changes: must be a list" },
    { "[{\"name\": \"a\", \"changes\": [1]}]", "changes[0]: must be an object" },
    { "[{\"name\": \"a\", \"changes\": [{}]}]", "changes[0]: holds none of \"set\", \"remove\", \"add\"" },
    { "[{\"name\": \"a\", \"changes\": [{\"set\": \"T1.p\", \"to\": 1, \"remove\": \"T1\"}]}]", "holds both \"set\" and \"remove\"" },
    { "[{\"name\": \"a\", \"changes\": [{\"set\": \"T1.p\"}]}]", "does not say to what" },
    { "[{\"name\": \"a\", \"changes\": [{\"set\": 3, \"to\": 1}]}]", "must name what it changes as a text, not a number" },
    { "[{\"name\": \"a\", \"changes\": [{\"set\": \"T1.p\", \"to\": {}}]}]", "sets something to an object" },
    { "[{\"name\": \"a\", \"changes\": [{\"set\": \"T1.p\", \"to\": 1, \"origin\": \"guessed\"}]}]", "“guessed” is no origin of a changed value" },
    { "[{\"name\": \"a\", \"changes\": [{\"remove\": \"\"}]}]", "with 1 to 256 bytes" },
    { "[{\"name\": \"a\", \"changes\": [{\"add\": \"V1\"}]}]", "must add an object with an \"id\"" },
  };
  for (guint i = 0; i < G_N_ELEMENTS (rows); i++)
    {
      g_autofree char *text = g_strdup_printf ("{\"heatloom\": 1,\n \"variants\": %s}", rows[i].variants);
      GError *error = NULL;
      g_assert_null (hl_document_from_json (text, -1, "f", &error));
      assert_message (&error, rows[i].says);
    }
}

/* Changes of good form that fit nothing: the reason names it. */
static void
test_reasons_why_changes_do_not_apply (void)
{
  static const struct { const char *change, *says; } rows[] = {
    { "{\"set\": \"X9.p\", \"to\": 1}", "there is no stream “X9”" },
    { "{\"set\": \"T1.wisdom\", \"to\": 1}", "has no quantity “wisdom”" },
    { "{\"set\": \"nothing\", \"to\": 1}", "names no quantity" },
    { "{\"set\": \"T1.isentropic_efficiency\", \"to\": 1.4}", "must lie above 0 and be at most 1" },
    { "{\"set\": \"T1.isentropic_efficiency\", \"to\": true}", "not true or false" },
    { "{\"set\": \"T1.isentropic_efficiency\", \"to\": \"2*Q1\"}", "“Q1” names no quantity" },
    { "{\"set\": \"T1.extractions\", \"to\": 99}", "must be a whole number from 0 to" },
    { "{\"set\": \"T1.expansion\", \"to\": \"crooked\"}", "“crooked” is none of" },
    { "{\"set\": \"T1.at\", \"to\": [1]}", "must be two whole numbers" },
    { "{\"set\": \"stream:live.medium\", \"to\": \"soup\"}", "“soup” is no medium" },
    { "{\"set\": \"plant.site.altitude\", \"to\": 60000}", "must be a number from -1000 to 11000" },
    { "{\"set\": \"plant.site.colour\", \"to\": 1}", "the plant has no quantity “site.colour”" },
    { "{\"remove\": \"X9\"}", "there is no X9 to be removed" },
    { "{\"add\": {\"id\": \"T1\", \"kind\": \"valve\"}}", "“T1” is already the id" },
    { "{\"add\": {\"id\": \"V1\", \"kind\": \"teapot\"}}", "“teapot” is not known" },
    { "{\"add\": {\"id\": \"8\", \"from\": \"T1.exhaust\", \"to\": \"C1.steam\"}}", "already has line 2" },
    { "{\"add\": {\"id\": \"S2\", \"joins\": [\"T1\", \"P1\"]}}", "T1 is already on shaft S1" },
  };
  const char *cut = strstr (LOOP_TEXT, ",\n \"variants\"");
  for (guint i = 0; i < G_N_ELEMENTS (rows); i++)
    {
      g_autofree char *text = g_strdup_printf ("%.*s, \"variants\": [{\"name\": \"a\", \"changes\": [%s]}]}", (int) (cut - LOOP_TEXT), LOOP_TEXT, rows[i].change);
      GError *error = NULL;
      g_autoptr (HlDocument) document = hl_document_from_json (text, -1, "f", &error);
      const HlUnapplied *unapplied;
      g_assert_no_error (error);
      g_assert_cmpuint (hl_document_unapplied (document, 0)->len, ==, 1);
      unapplied = hl_document_unapplied (document, 0)->pdata[0];
      if (strstr (unapplied->why, rows[i].says) == NULL)
        g_error ("%s: “%s” does not say “%s”", rows[i].change, unapplied->why, rows[i].says);
      g_assert_true (hl_plant_equal (hl_document_plant (document, 0), hl_document_plant (document, HL_DOCUMENT_BASE)));
    }
}

int
main (int argc, char **argv)
{
  g_test_init (&argc, &argv, NULL);
  g_test_add_func ("/document/text-is-written-as-read", test_text_is_written_as_read);
  g_test_add_func ("/document/plants-of-variants", test_plants_of_variants);
  g_test_add_func ("/document/edits-go-to-the-variant-in-view", test_edits_go_to_the_variant_in_view);
  g_test_add_func ("/document/unknown-keys-of-changes-stay", test_unknown_keys_of_changes_stay);
  g_test_add_func ("/document/base-edits-reach-the-variants", test_base_edits_reach_the_variants);
  g_test_add_func ("/document/changes-without-a-place-are-kept", test_changes_without_a_place_are_kept);
  g_test_add_func ("/document/names-and-order", test_names_and_order);
  g_test_add_func ("/document/promoted-variant-leaves-all-plants-alone", test_promoted_variant_leaves_all_plants_alone);
  g_test_add_func ("/document/ids-of-variants-are-not-given-out", test_ids_of_variants_are_not_given_out);
  g_test_add_func ("/document/changes-lead-from-any-plant-to-any-other", test_changes_lead_from_any_plant_to_any_other);
  g_test_add_func ("/document/random-edits-come-back-as-changes", test_random_edits_come_back_as_changes);
  g_test_add_func ("/document/words-of-changes", test_words_of_changes);
  g_test_add_func ("/document/refused-texts", test_refused_texts);
  g_test_add_func ("/document/reasons-why-changes-do-not-apply", test_reasons_why_changes_do_not_apply);
  return g_test_run ();
}
