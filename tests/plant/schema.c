/* The JSON schema of plant files, made from the tables of kinds; the one in data/schema must be just that.
 *   test-plant-schema --write FILE    makes it anew after a change of the tables
 *   test-plant-schema --plants DIR    writes plants to be validated against it
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "plant-test.h"

static const char *const dimension_ids[HL_N_DIMENSIONS] = {
  "ratio", "pressure", "pressure_difference", "temperature", "temperature_difference", "mass_flow", "enthalpy", "entropy",
  "volume", "power", "conductance", "length", "heat_rate", "steam_rate", "volume_flow", "emission", "area", "aperture", "irradiance", "count",
};

static void
append_limits (GString *out, const HlQuantityKind *q)
{
  g_autofree char *above = hl_number_to_text (q->above), *most = hl_number_to_text (q->at_most);
  if (q->above < 0.0 && q->above >= HL_FROM_ZERO)
    g_string_append (out, "\"minimum\": 0");
  else
    g_string_append_printf (out, "\"exclusiveMinimum\": %s", above);
  g_string_append_printf (out, ", \"maximum\": %s", most);
}

static void
append_quantity (GString *out, const char *pattern, const HlQuantityKind *q)
{
  g_string_append_printf (out, "    \"%s\": {\"$ref\": \"#/$defs/%s\", \"title\": \"%s\", \"description\": \"%s\", ", pattern,
                          dimension_ids[q->dimension], q->name, q->help);
  append_limits (out, q);
  g_string_append_c (out, '}');
}

static int
option_most (const HlKind *kind, const char *option)
{
  return option != NULL ? kind->options[hl_kind_find_option (kind, option)].most : 0;
}

/* "extraction#.p" to "extraction[1-8]\\.p", as it stands in JSON. */
static char *
key_pattern (const HlKind *kind, const char *key, const char *repeat, int extra)
{
  GString *pattern = g_string_new (key);
  g_autofree char *digits = g_strdup_printf ("[1-%d]", option_most (kind, repeat) + extra);
  g_string_replace (pattern, ".", "\\\\.", 0);
  g_string_replace (pattern, "#", digits, 0);
  return g_string_free (pattern, FALSE);
}

static void
append_kind (GString *out, const HlKind *kind)
{
  g_autoptr (GString) ports = g_string_new (NULL);
  const HlQuantityKind *states;
  const char *between = "";
  guint n_states;
  g_string_append_printf (out, "  \"values_of_%s\": {\"type\": \"object\", \"additionalProperties\": false, \"patternProperties\": {\n", kind->id);
  for (guint i = 0; i < kind->n_quantities; i++)
    {
      const HlQuantityKind *q = &kind->quantities[i];
      g_autofree char *key = key_pattern (kind, q->key, q->repeat, q->repeat_extra), *pattern = g_strdup_printf ("^%s$", key);
      g_string_append (out, between);
      append_quantity (out, pattern, q);
      between = ",\n";
    }
  for (guint i = 0; i < kind->n_ports; i++)
    {
      g_autofree char *key = key_pattern (kind, kind->ports[i].key, kind->ports[i].repeat, 0);
      g_string_append_printf (ports, "%s%s", i > 0 ? "|" : "", key);
    }
  states = hl_stream_quantities (&n_states);
  for (guint i = 0; i < n_states && ports->len > 0; i++)
    {
      if (states[i].flags & HL_QUANTITY_DERIVED)
        continue;
      g_autofree char *pattern = g_strdup_printf ("^(%s)\\\\.%s$", ports->str, states[i].key);
      g_string_append (out, between);
      append_quantity (out, pattern, &states[i]);
      between = ",\n";
    }
  g_string_append_printf (out, "}},\n  \"%s\": {\"title\": \"%s\", \"description\": \"%s\", \"properties\": {\n", kind->id, kind->name, kind->help);
  for (guint i = 0; i < kind->n_options; i++)
    {
      const HlOptionKind *option = &kind->options[i];
      if (option->choices != NULL)
        {
          g_autofree char *words = g_strjoinv ("\", \"", (char **) option->choices);
          g_string_append_printf (out, "    \"%s\": {\"enum\": [\"%s\"]},\n", option->key, words);
        }
      else
        g_string_append_printf (out, "    \"%s\": {\"type\": \"integer\", \"minimum\": %d, \"maximum\": %d},\n", option->key, option->least, option->most);
    }
  g_string_append_printf (out, "    \"given\": {\"$ref\": \"#/$defs/values_of_%s\"},\n    \"assumed\": {\"$ref\": \"#/$defs/values_of_%s\"}}},\n", kind->id, kind->id);
}

static void
append_values (GString *out, const char *name, const HlQuantityKind *quantities, guint n)
{
  const char *between = "";
  g_string_append_printf (out, "  \"%s\": {\"type\": \"object\", \"additionalProperties\": false, \"patternProperties\": {\n", name);
  for (guint i = 0; i < n; i++)
    {
      g_autofree char *pattern = g_strdup_printf ("^%s$", quantities[i].key);
      if (quantities[i].flags & HL_QUANTITY_DERIVED)
        continue;
      g_string_append (out, between);
      append_quantity (out, pattern, &quantities[i]);
      between = ",\n";
    }
  g_string_append (out, "}},\n");
}

static const char head[] =
  "{\"$schema\": \"https://json-schema.org/draft/2020-12/schema\",\n"
  " \"$id\": \"urn:heatloom:plant:1\",\n"
  " \"title\": \"Heatloom plant, version 1\",\n"
  " \"description\": \"A thermal cycle as drawn. All numbers are in the SI unit of their dimension, which $defs names. Unknown keys are kept.\",\n"
  " \"type\": \"object\",\n"
  " \"required\": [\"heatloom\"],\n"
  " \"properties\": {\n"
  "  \"heatloom\": {\"description\": \"version of the format\", \"const\": 1},\n"
  "  \"title\": {\"type\": \"string\"},\n"
  "  \"units\": {\"description\": \"units shown on screen; the file is in SI\", \"enum\": [\"metric\", \"si\", \"us\"]},\n"
  "  \"formulation\": {\"description\": \"of water and steam\", \"enum\": [\"if97\", \"iapws95\"]},\n"
  "  \"site\": {\"type\": \"object\", \"properties\": {\n"
  "    \"altitude\": {\"$ref\": \"#/$defs/length\", \"minimum\": -1000, \"maximum\": 11000},\n"
  "    \"ambient_T\": {\"$ref\": \"#/$defs/temperature\", \"minimum\": 173.15, \"maximum\": 373.15},\n"
  "    \"wet_bulb_T\": {\"$ref\": \"#/$defs/temperature\", \"minimum\": 173.15, \"maximum\": 373.15},\n"
  "    \"dead_T\": {\"$ref\": \"#/$defs/temperature\", \"minimum\": 173.15, \"maximum\": 373.15},\n"
  "    \"dead_p\": {\"$ref\": \"#/$defs/pressure\", \"minimum\": 1000, \"maximum\": 10000000}}},\n"
  "  \"components\": {\"type\": \"array\", \"maxItems\": 20000, \"items\": {\"$ref\": \"#/$defs/component\"}},\n"
  "  \"streams\": {\"type\": \"array\", \"maxItems\": 20000, \"items\": {\"$ref\": \"#/$defs/stream\"}},\n"
  "  \"shafts\": {\"type\": \"array\", \"maxItems\": 20000, \"items\": {\"type\": \"object\", \"required\": [\"id\", \"joins\"], \"properties\": {\n"
  "    \"id\": {\"$ref\": \"#/$defs/id\"},\n"
  "    \"joins\": {\"type\": \"array\", \"minItems\": 1, \"uniqueItems\": true, \"items\": {\"$ref\": \"#/$defs/id\"}}}}},\n"
  "  \"plant\": {\"type\": \"object\", \"properties\": {\n"
  "    \"given\": {\"$ref\": \"#/$defs/values_of_the_plant\"},\n"
  "    \"assumed\": {\"$ref\": \"#/$defs/values_of_the_plant\"},\n"
  "    \"tied\": {\"$ref\": \"#/$defs/tied\"}}},\n"
  "  \"dismissed\": {\"description\": \"findings that were put aside\", \"type\": \"array\", \"maxItems\": 5000, \"items\": {\"type\": \"object\", \"required\": [\"code\", \"at\"], \"properties\": {\n"
  "    \"code\": {\"type\": \"string\", \"pattern\": \"^[a-z0-9-]{1,64}$\"},\n"
  "    \"at\": {\"description\": \"address, or the id of a component, stream:ID, plant\", \"type\": \"string\"}}}},\n"
  "  \"variants\": {\"description\": \"what-ifs, each the ordered differences from the plant above\", \"type\": \"array\", \"maxItems\": 200, \"items\": {\n"
  "    \"type\": \"object\", \"required\": [\"name\"], \"properties\": {\n"
  "    \"name\": {\"type\": \"string\", \"minLength\": 1, \"maxLength\": 200, \"pattern\": \"^[^\\\\s](.*[^\\\\s])?$\"},\n"
  "    \"changes\": {\"type\": \"array\", \"maxItems\": 20000, \"items\": {\"$ref\": \"#/$defs/change\"}}}}}},\n"
  " \"$defs\": {\n";

static const char middle[] =
  "  \"change\": {\"type\": \"object\", \"oneOf\": [\n"
  "    {\"required\": [\"set\", \"to\"], \"properties\": {\n"
  "     \"set\": {\"description\": \"address of a quantity, or an option, place or name: T1.inlet.p, T1.extractions, T1.at, stream:1.medium, plant.site.ambient_T\", \"type\": \"string\", \"minLength\": 1, \"maxLength\": 256},\n"
  "     \"to\": {\"description\": \"a number in SI, a tie or word, a place, or null where the quantity shall be found\", \"type\": [\"number\", \"string\", \"boolean\", \"array\", \"null\"]},\n"
  "     \"origin\": {\"enum\": [\"given\", \"assumed\"]}}},\n"
  "    {\"required\": [\"remove\"], \"properties\": {\"remove\": {\"description\": \"id of a component, stream or shaft\", \"$ref\": \"#/$defs/id\"}}},\n"
  "    {\"required\": [\"add\"], \"properties\": {\"add\": {\"description\": \"a component, stream or shaft as it stands in its list\", \"type\": \"object\", \"required\": [\"id\"], \"properties\": {\"id\": {\"$ref\": \"#/$defs/id\"}}}}}]},\n"
  "  \"id\": {\"type\": \"string\", \"minLength\": 1, \"maxLength\": 32, \"pattern\": \"^[^\\\\s.:*/+()-]+$\"},\n"
  "  \"place\": {\"description\": \"x to the right, y downwards, in grid units\", \"type\": \"array\", \"items\": {\"type\": \"integer\"}, \"minItems\": 2, \"maxItems\": 2},\n"
  "  \"tied\": {\"description\": \"an expression of other quantities in SI, for instance 0.23*B1.steam.p or (H1.heat+H2.heat)/2\", \"type\": \"object\", \"additionalProperties\": {\"type\": \"string\"}},\n"
  "  \"end\": {\"description\": \"component.port\", \"type\": \"string\", \"pattern\": \"^[^.]+\\\\.[^.]+$\"},\n"
  "  \"stream\": {\"type\": \"object\", \"required\": [\"id\", \"from\", \"to\"], \"properties\": {\n"
  "    \"id\": {\"$ref\": \"#/$defs/id\"},\n"
  "    \"from\": {\"$ref\": \"#/$defs/end\"},\n"
  "    \"to\": {\"$ref\": \"#/$defs/end\"},\n"
  "    \"medium\": {\"type\": \"string\"},\n"
  "    \"route\": {\"description\": \"bends set by hand\", \"type\": \"array\", \"maxItems\": 1000, \"items\": {\"$ref\": \"#/$defs/place\"}},\n"
  "    \"label\": {\"$ref\": \"#/$defs/place\"},\n"
  "    \"given\": {\"$ref\": \"#/$defs/values_of_a_stream\"},\n"
  "    \"assumed\": {\"$ref\": \"#/$defs/values_of_a_stream\"},\n"
  "    \"tied\": {\"$ref\": \"#/$defs/tied\"}}},\n"
  "  \"component\": {\"type\": \"object\", \"required\": [\"id\", \"kind\"], \"properties\": {\n"
  "    \"id\": {\"$ref\": \"#/$defs/id\"},\n"
  "    \"name\": {\"type\": \"string\"},\n"
  "    \"at\": {\"$ref\": \"#/$defs/place\"},\n"
  "    \"turn\": {\"description\": \"quarter turns clockwise\", \"type\": \"integer\", \"minimum\": 0, \"maximum\": 3},\n"
  "    \"mirror\": {\"description\": \"left-right, before turning\", \"type\": \"boolean\"},\n"
  "    \"tied\": {\"$ref\": \"#/$defs/tied\"},\n";

static char *
make_schema (void)
{
  GString *out = g_string_new (head);
  guint n;
  const HlQuantityKind *quantities;
  for (int i = 0; i < HL_N_DIMENSIONS; i++)
    {
      const char *unit = hl_dimension_si_unit ((HlDimension) i);
      g_string_append_printf (out, "  \"%s\": {\"description\": \"%s in %s\", \"type\": \"number\"},\n", dimension_ids[i],
                              hl_dimension_name ((HlDimension) i), *unit != '\0' ? unit : "no unit");
    }
  g_string_append (out, middle);
  g_string_append (out, "    \"kind\": {\"enum\": [");
  for (guint k = 0; k < hl_kind_count (); k++)
    g_string_append_printf (out, "%s\"%s\"", k > 0 ? ", " : "", hl_kind_nth (k)->id);
  g_string_append (out, "]}},\n   \"allOf\": [\n");
  for (guint k = 0; k < hl_kind_count (); k++)
    g_string_append_printf (out, "    {\"if\": {\"properties\": {\"kind\": {\"const\": \"%s\"}}}, \"then\": {\"$ref\": \"#/$defs/%s\"}}%s\n",
                            hl_kind_nth (k)->id, hl_kind_nth (k)->id, k + 1 < hl_kind_count () ? "," : "]},");
  for (guint k = 0; k < hl_kind_count (); k++)
    append_kind (out, hl_kind_nth (k));
  quantities = hl_stream_quantities (&n);
  append_values (out, "values_of_a_stream", quantities, n);
  quantities = hl_plant_quantities (&n);
  append_values (out, "values_of_the_plant", quantities, n);
  g_string_truncate (out, out->len - 2);
  g_string_append (out, "}}\n");
  return g_string_free (out, FALSE);
}

static void
test_schema_is_what_the_tables_say (void)
{
  g_autofree char *path = g_test_build_filename (G_TEST_DIST, "..", "data", "schema", "heatloom-1.schema.json", NULL);
  g_autofree char *made = make_schema (), *text = NULL;
  GError *error = NULL;
  g_file_get_contents (path, &text, NULL, &error);
  g_assert_no_error (error);
  if (!g_str_equal (text, made))
    g_error ("%s does not fit the tables of kinds; run test-plant-schema --write %s", path, path);
}

/* A value within the hard limits of a quantity. */
static double
some_value (const HlQuantityKind *q, int number)
{
  double usual = hl_quantity_default (q, number);
  return isnan (usual) ? (MAX (q->above, 0.0) + MIN (q->at_most, 1000.0)) / 2.0 : usual;
}

/* Every kind, every count at most and every choice, every quantity given. */
static HlPlant *
plant_of_everything (void)
{
  HlPlant *plant = hl_plant_new ();
  for (guint k = 0; k < hl_kind_count (); k++)
    for (int choice = 0; choice <= 1; choice++)
      {
        g_autofree char *id = g_strdup_printf ("%s%d", hl_kind_nth (k)->letter, choice + 1);
        HlComponent *component = hl_component_new (hl_kind_nth (k), id, 5, 6);
        HlPlant *next;
        for (guint i = 0; i < component->kind->n_options; i++)
          hl_component_set_option (component, component->kind->options[i].key, component->kind->options[i].choices != NULL ? choice : 9);
        for (guint i = 0; i < hl_component_n_quantities (component); i++)
          {
            HlQuantity quantity = hl_component_quantity (component, i);
            HlValue value = { .origin = HL_ORIGIN_GIVEN, .value = some_value (quantity.kind, quantity.number) };
            if (quantity.kind->flags & HL_QUANTITY_DERIVED)
              continue;
            hl_component_set_value (component, quantity.key, &value);
          }
        next = hl_plant_with_component (plant, component);
        hl_plant_unref (plant);
        plant = next;
      }
  return plant;
}

static int
write_plants (const char *folder)
{
  g_autoptr (HlPlant) everything = plant_of_everything (), loop = loop_plant ();
  g_autofree char *first = g_build_filename (folder, "everything.heatloom", NULL), *second = g_build_filename (folder, "loop.heatloom", NULL);
  g_autoptr (GError) error = NULL;
  if (hl_plant_save (everything, first, &error) && hl_plant_save (loop, second, &error))
    return 0;
  g_printerr ("%s\n", error->message);
  return 1;
}

int
main (int argc, char **argv)
{
  if (argc == 3 && g_str_equal (argv[1], "--plants"))
    return write_plants (argv[2]);
  if (argc == 3 && g_str_equal (argv[1], "--write"))
    {
      g_autofree char *text = make_schema ();
      return g_file_set_contents (argv[2], text, -1, NULL) ? 0 : 1;
    }
  g_test_init (&argc, &argv, NULL);
  g_test_add_func ("/schema/schema-is-what-the-tables-say", test_schema_is_what_the_tables_say);
  return g_test_run ();
}
