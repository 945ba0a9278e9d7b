/* JSON text to plants: every refusal says where, what and how to mend.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "plant/json-reader.h"
#include "plant/circuit.h"
#include "plant/i18n.h"
#include <math.h>
#include <string.h>

#define MAX_FILE   (16 * 1024 * 1024)
#define MAX_ITEMS  20000
#define MAX_ROUTE  1000
#define VERSION    1

/* Items of the lists. */

static gboolean
read_id (HlReader *reader, JsonObject *object, gboolean is_stream, GHashTable *ids)
{
  const char *id = NULL, *other;
  if (!hl_reader_string (reader, object, "id", &id))
    return FALSE;
  if (id == NULL)
    return hl_reader_refuse (reader, "id", _("is missing; every item needs one, for instance \"T1\""));
  if (!hl_id_is_valid (id, is_stream))
    {
      g_autofree char *clipped = hl_reader_clip (id);
      return hl_reader_refuse (reader, "id", is_stream ? _("“%s” is no id: letters, digits and _ only, at most 32, and neither “plant” nor “stream”")
                                                       : _("“%s” is no id: a letter first, then letters, digits and _ only, at most 32, and neither “plant” nor “stream”"), clipped);
    }
  other = g_hash_table_lookup (ids, id);
  if (other != NULL)
    return hl_reader_refuse (reader, "id", _("“%s” is already the id of an item of %s; ids must be unique, so rename one"), id, other);
  reader->id = g_intern_string (id);
  g_hash_table_insert (ids, (gpointer) reader->id, (gpointer) reader->list);
  return TRUE;
}

gboolean
hl_reader_option (HlReader *reader, JsonObject *object, HlComponent *component, guint n)
{
  const HlOptionKind *option = &component->kind->options[n];
  const char *word = NULL;
  if (option->choices == NULL)
    return hl_reader_int (reader, object, option->key, option->least, option->most, &component->options[n]);
  if (!hl_reader_string (reader, object, option->key, &word))
    return FALSE;
  if (word == NULL)
    return TRUE;
  for (int i = 0; option->choices[i] != NULL; i++)
    if (g_str_equal (option->choices[i], word))
      {
        component->options[n] = i;
        return TRUE;
      }
  {
    g_autofree char *words = g_strjoinv ("”, “", (char **) option->choices);
    return hl_reader_refuse (reader, option->key, _("“%s” is none of “%s”"), word, words);
  }
}

static gboolean
read_kind (HlReader *reader, JsonObject *object, const HlKind **kind)
{
  const char *word = NULL;
  g_autoptr (GString) known = NULL;
  if (!hl_reader_string (reader, object, "kind", &word))
    return FALSE;
  *kind = word != NULL ? hl_kind_lookup (word) : NULL;
  if (*kind != NULL)
    return TRUE;
  known = g_string_new (NULL);
  for (guint i = 0; i < hl_kind_count (); i++)
    g_string_append_printf (known, "%s%s", i > 0 ? ", " : "", hl_kind_nth (i)->id);
  if (word == NULL)
    return hl_reader_refuse (reader, "kind", _("is missing; it is one of %s"), known->str);
  return hl_reader_refuse (reader, "kind", _("“%s” is not known; it is one of %s"), word, known->str);
}

static gboolean
read_component (HlReader *reader, JsonObject *object, GHashTable *ids)
{
  static const char *const known[] = { "id", "kind", "name", "at", "turn", "mirror", "given", "assumed", "tied", NULL };
  g_autoptr (HlComponent) component = NULL;
  const HlKind *kind;
  const char *name = NULL;
  HlGridPoint at = { 0, 0 };
  if (!read_id (reader, object, FALSE, ids) || !read_kind (reader, object, &kind))
    return FALSE;
  component = hl_component_new_bare (kind, reader->id, 0, 0);
  if (!hl_reader_string (reader, object, "name", &name) || !hl_reader_point (reader, object, "at", &at)
      || !hl_reader_int (reader, object, "turn", 0, 3, &component->turn)
      || !hl_reader_boolean (reader, object, "mirror", &component->is_mirrored))
    return FALSE;
  hl_component_set_name (component, name);
  component->x = at.x;
  component->y = at.y;
  for (guint i = 0; i < kind->n_options; i++)
    if (!hl_reader_option (reader, object, component, i))
      return FALSE;
  component->extra = hl_reader_unknown (object, known, kind);
  g_ptr_array_add (reader->plant->components, g_steal_pointer (&component));
  return TRUE;
}

/* "B1.steam" to its two parts. */
static gboolean
read_end (HlReader *reader, JsonObject *object, const char *key, char **id, char **port)
{
  const char *text = NULL, *dot;
  if (!hl_reader_string (reader, object, key, &text))
    return FALSE;
  dot = text != NULL ? strchr (text, '.') : NULL;
  if (dot == NULL)
    return hl_reader_refuse (reader, key, _("must name a component and its port, for instance \"B1.steam\""));
  *id = g_strndup (text, (gsize) (dot - text));
  *port = g_strdup (dot + 1);
  return TRUE;
}

/* Two lines at one port; @taken maps "id.port" to the stream that is there. */
static gboolean
take_port (HlReader *reader, const char *key, GHashTable *taken, const char *id, const char *port)
{
  char *name = g_strdup_printf ("%s.%s", id, port);
  const char *other = g_hash_table_lookup (taken, name);
  if (other != NULL)
    {
      gboolean ok = hl_reader_refuse (reader, key, _("%s already has stream %s; a port holds one line, so put a splitter or a mixer there"), name, other);
      g_free (name);
      return ok;
    }
  g_hash_table_insert (taken, name, (gpointer) reader->id);
  return TRUE;
}

gboolean
hl_reader_route (HlReader *reader, JsonObject *object, HlStream *stream)
{
  JsonArray *points = NULL;
  if (!hl_reader_list (reader, object, "route", MAX_ROUTE, &points))
    return FALSE;
  g_free (stream->route);
  stream->n_route = points != NULL ? json_array_get_length (points) : 0;
  stream->route = g_new0 (HlGridPoint, stream->n_route);
  for (guint i = 0; i < stream->n_route; i++)
    if (!hl_reader_node_to_point (json_array_get_element (points, i), &stream->route[i]))
      return hl_reader_refuse (reader, "route", _("must be a list of bends, each [x, y] in grid units"));
  return TRUE;
}

gboolean
hl_reader_label (HlReader *reader, JsonObject *object, HlStream *stream)
{
  HlGridPoint label = { stream->label_x, stream->label_y };
  if (!hl_reader_point (reader, object, "label", &label))
    return FALSE;
  stream->has_label_place = json_object_has_member (object, "label");
  stream->label_x = label.x;
  stream->label_y = label.y;
  return TRUE;
}

static gboolean
read_stream (HlReader *reader, JsonObject *object, GHashTable *ids, GHashTable *taken)
{
  static const char *const known[] = { "id", "from", "to", "medium", "route", "label", "given", "assumed", "tied", NULL };
  g_autofree char *from_id = NULL, *from_port = NULL, *to_id = NULL, *to_port = NULL;
  g_autoptr (HlStream) stream = NULL;
  GError *why = NULL;
  const char *medium = "water";
  if (!read_id (reader, object, TRUE, ids)
      || !read_end (reader, object, "from", &from_id, &from_port) || !read_end (reader, object, "to", &to_id, &to_port)
      || !hl_reader_string (reader, object, "medium", &medium))
    return FALSE;
  if (!hl_plant_can_connect (reader->plant, from_id, from_port, to_id, to_port, &why))
    return hl_reader_refuse_with (reader, NULL, why);
  if (!take_port (reader, "from", taken, from_id, from_port) || !take_port (reader, "to", taken, to_id, to_port))
    return FALSE;
  if (hl_fluid_lookup (medium) == NULL)
    return hl_reader_refuse (reader, "medium", _("“%s” is not a medium known here; heatloom-batch fluids lists them"), medium);
  stream = hl_stream_new (reader->id, from_id, from_port, to_id, to_port);
  stream->medium = g_intern_string (medium);
  if (!hl_reader_route (reader, object, stream) || !hl_reader_label (reader, object, stream))
    return FALSE;
  stream->extra = hl_reader_unknown (object, known, NULL);
  g_ptr_array_add (reader->plant->streams, g_steal_pointer (&stream));
  return TRUE;
}

static gboolean
read_join (HlReader *reader, JsonNode *node, GHashTable *taken, const char **id)
{
  const HlComponent *component = hl_reader_is_string (node) ? hl_plant_find_component (reader->plant, json_node_get_string (node)) : NULL;
  const char *other;
  if (component == NULL)
    return hl_reader_refuse (reader, "joins", _("must name components of this plant; %s is none"), hl_reader_is_string (node) ? json_node_get_string (node) : hl_reader_type (node));
  if (component->kind->shaft == HL_SHAFT_NONE)
    return hl_reader_refuse (reader, "joins", _("%s (%s) has no shaft; turbines, pumps and generators have"), component->id, _(component->kind->name));
  other = g_hash_table_lookup (taken, component->id);
  if (other != NULL)
    return hl_reader_refuse (reader, "joins", _("%s is already on shaft %s; take it off one of them"), component->id, other);
  g_hash_table_insert (taken, (gpointer) component->id, (gpointer) reader->id);
  *id = component->id;
  return TRUE;
}

static gboolean
read_shaft (HlReader *reader, JsonObject *object, GHashTable *ids, GHashTable *taken)
{
  static const char *const known[] = { "id", "joins", NULL };
  g_autoptr (HlShaft) shaft = NULL;
  g_autofree const char **joins = NULL;
  JsonArray *list = NULL;
  guint n;
  if (!read_id (reader, object, FALSE, ids) || !hl_reader_list (reader, object, "joins", MAX_ITEMS, &list))
    return FALSE;
  n = list != NULL ? json_array_get_length (list) : 0;
  if (n == 0)
    return hl_reader_refuse (reader, "joins", _("is missing or empty; list the components on the shaft, for instance [\"T1\", \"G1\"]"));
  joins = g_new0 (const char *, n);
  for (guint i = 0; i < n; i++)
    if (!read_join (reader, json_array_get_element (list, i), taken, &joins[i]))
      return FALSE;
  shaft = hl_shaft_new (reader->id, joins, n);
  shaft->extra = hl_reader_unknown (object, known, NULL);
  g_ptr_array_add (reader->plant->shafts, g_steal_pointer (&shaft));
  return TRUE;
}

typedef gboolean (*ReadItem) (HlReader *reader, JsonObject *object, GHashTable *ids, GHashTable *taken);

static gboolean
read_component_item (HlReader *reader, JsonObject *object, GHashTable *ids, G_GNUC_UNUSED GHashTable *taken)
{
  return read_component (reader, object, ids);
}

/* Goes through a list of objects, with the reader set to each. */
static gboolean
read_items (HlReader *reader, JsonObject *top, const char *list, GHashTable *ids, ReadItem read)
{
  g_autoptr (GHashTable) taken = g_hash_table_new_full (g_str_hash, g_str_equal, g_str_equal (list, "streams") ? g_free : NULL, NULL);
  JsonArray *array = NULL;
  if (!hl_reader_list (reader, top, list, MAX_ITEMS, &array))
    return FALSE;
  for (guint i = 0; array != NULL && i < json_array_get_length (array); i++)
    {
      JsonNode *node = json_array_get_element (array, i);
      reader->list = list;
      reader->item = i;
      reader->id = NULL;
      if (!JSON_NODE_HOLDS_OBJECT (node))
        return hl_reader_refuse (reader, NULL, _("must be an object in { }, not %s"), hl_reader_type (node));
      if (!read (reader, json_node_get_object (node), ids, taken))
        return FALSE;
    }
  reader->list = NULL;
  reader->id = NULL;
  return TRUE;
}

/* Values of the items. */

typedef struct { HlOwner owner; const char *id; HlValues *values; } Target;

static HlAddress
address_of (const Target *target, const char *key)
{
  return (HlAddress) { target->owner, g_intern_string (target->id), g_intern_string (key) };
}

static gboolean
refuse_key (HlReader *reader, const char *path, const Target *target, const char *key)
{
  const HlComponent *component;
  if (target->owner == HL_OWNER_STREAM)
    return hl_reader_refuse (reader, path, _("a stream has no quantity “%s”; it has m, p, T, h, s, x and v"), key);
  if (target->owner == HL_OWNER_PLANT)
    return hl_reader_refuse (reader, path, _("the plant has no quantity “%s”; heatloom-batch kinds lists them"), key);
  component = hl_plant_find_component (reader->plant, target->id);
  return hl_reader_refuse (reader, path, _("%s (%s) has no quantity “%s”; heatloom-batch kinds lists them, and each port has m, p, T, h, s, x and v"),
                 target->id, _(component->kind->name), key);
}

static gboolean
read_value_node (HlReader *reader, const char *path, const HlAddress *address, const HlQuantityKind *kind, HlOrigin origin,
                 JsonNode *node, HlValue *value)
{
  g_autofree char *where = hl_address_to_text (address);
  GError *why = NULL;
  if (origin != HL_ORIGIN_TIED)
    {
      if (!hl_reader_is_number (node))
        return hl_reader_refuse (reader, path, _("must be a number in %s, not %s"),
                       *hl_dimension_si_unit (kind->dimension) != '\0' ? hl_dimension_si_unit (kind->dimension) : _("no unit"), hl_reader_type (node));
      *value = (HlValue) { .origin = origin, .value = json_node_get_double (node) };
      if (!hl_quantity_check (kind, where, value->value, reader->plant->units, &why))
        return hl_reader_refuse_with (reader, path, why);
      return TRUE;
    }
  if (!hl_reader_is_string (node))
    return hl_reader_refuse (reader, path, _("must be a tie as a text, for instance \"0.23*B1.steam.p\", not %s"), hl_reader_type (node));
  if (!hl_tie_read (reader->plant, address, json_node_get_string (node), TRUE, value, &why))
    return hl_reader_refuse_with (reader, path, why);
  if (value->origin != HL_ORIGIN_TIED)
    return hl_reader_refuse (reader, path, _("“%s” names no other quantity; put a plain number under \"given\""), json_node_get_string (node));
  return TRUE;
}

static gboolean
read_origin (HlReader *reader, JsonObject *object, const char *prefix, const Target *target, HlOrigin origin)
{
  g_autofree char *section = g_strconcat (prefix, hl_origin_id (origin), NULL);
  JsonObject *values = NULL;
  JsonObjectIter iter;
  const char *key;
  JsonNode *node;
  if (!hl_reader_object (reader, object, hl_origin_id (origin), &values))
    return FALSE;
  if (values == NULL)
    return TRUE;
  json_object_iter_init_ordered (&iter, values);
  while (json_object_iter_next_ordered (&iter, &key, &node))
    {
      g_autofree char *clipped = hl_reader_clip (key), *path = g_strdup_printf ("%s.%s", section, clipped);
      const HlValue *present = hl_values_find (target->values, key);
      const HlQuantityKind *kind;
      HlAddress address;
      HlValue value;
      if (strlen (key) > 80)   /* no quantity has such a name, and keys are interned */
        return refuse_key (reader, path, target, clipped);
      address = address_of (target, key);
      kind = hl_plant_quantity_kind (reader->plant, &address);
      if (kind == NULL)
        return refuse_key (reader, path, target, clipped);
      if (present != NULL)
        return hl_reader_refuse (reader, path, _("stands under “%s” too; a quantity has one origin, so remove one of them"), hl_origin_id (present->origin));
      if (!read_value_node (reader, path, &address, kind, origin, node, &value))
        return FALSE;
      hl_values_set (target->values, key, &value);
    }
  return TRUE;
}

static gboolean
read_values (HlReader *reader, JsonObject *object, const char *prefix, const Target *target)
{
  return read_origin (reader, object, prefix, target, HL_ORIGIN_GIVEN)
         && read_origin (reader, object, prefix, target, HL_ORIGIN_ASSUMED)
         && read_origin (reader, object, prefix, target, HL_ORIGIN_TIED);
}

/* Values come last, when every address they may name is there. */
static gboolean
read_all_values (HlReader *reader, JsonObject *top)
{
  HlPlant *plant = reader->plant;
  JsonObject *plant_object = NULL;
  Target whole = { HL_OWNER_PLANT, "", &plant->values };
  static const char *const known[] = { "given", "assumed", "tied", NULL };
  for (guint i = 0; i < plant->components->len; i++)
    {
      HlComponent *component = plant->components->pdata[i];
      Target target = { HL_OWNER_COMPONENT, component->id, &component->values };
      reader->list = "components";
      reader->item = i;
      reader->id = component->id;
      if (!read_values (reader, json_array_get_object_element (json_object_get_array_member (top, "components"), i), "", &target))
        return FALSE;
    }
  for (guint i = 0; i < plant->streams->len; i++)
    {
      HlStream *stream = plant->streams->pdata[i];
      Target target = { HL_OWNER_STREAM, stream->id, &stream->values };
      reader->list = "streams";
      reader->item = i;
      reader->id = stream->id;
      if (!read_values (reader, json_array_get_object_element (json_object_get_array_member (top, "streams"), i), "", &target))
        return FALSE;
    }
  reader->list = NULL;
  reader->id = NULL;
  if (!hl_reader_object (reader, top, "plant", &plant_object))
    return FALSE;
  if (plant_object == NULL)
    return TRUE;
  plant->plant_extra = hl_reader_unknown (plant_object, known, NULL);
  return read_values (reader, plant_object, "plant.", &whole);
}

/* The whole file. */

static gboolean
read_site_number (HlReader *reader, JsonObject *site, const char *key, double least, double most, double *result)
{
  g_autofree char *path = g_strconcat ("site.", key, NULL);
  JsonNode *node = hl_reader_member (site, key);
  double number;
  if (node == NULL)
    return TRUE;
  if (!hl_reader_is_number (node))
    return hl_reader_refuse (reader, path, _("must be a number in the SI unit, not %s"), hl_reader_type (node));
  number = json_node_get_double (node);
  if (!(number >= least && number <= most))
    {
      g_autofree char *why = g_strdup_printf (_("%g lies outside %g to %g (SI)"), number, least, most);
      return hl_reader_refuse_as (reader, HL_PLANT_ERROR_OUT_OF_RANGE, path, why);
    }
  *result = number;
  return TRUE;
}

static gboolean
read_site (HlReader *reader, JsonObject *top)
{
  static const char *const known[] = { "altitude", "ambient_T", "wet_bulb_T", "dead_T", "dead_p", NULL };
  HlSite *site = &reader->plant->site;
  JsonObject *object = NULL;
  if (!hl_reader_object (reader, top, "site", &object))
    return FALSE;
  if (object == NULL)
    return TRUE;
  reader->plant->site_extra = hl_reader_unknown (object, known, NULL);
  return read_site_number (reader, object, "altitude", HL_SITE_LEAST_ALTITUDE, HL_SITE_MOST_ALTITUDE, &site->altitude)
         && read_site_number (reader, object, "ambient_T", HL_SITE_LEAST_T, HL_SITE_MOST_T, &site->ambient_T)
         && read_site_number (reader, object, "wet_bulb_T", HL_SITE_LEAST_T, HL_SITE_MOST_T, &site->wet_bulb_T)
         && read_site_number (reader, object, "dead_T", HL_SITE_LEAST_T, HL_SITE_MOST_T, &site->dead_T)
         && read_site_number (reader, object, "dead_p", HL_SITE_LEAST_P, HL_SITE_MOST_P, &site->dead_p);
}

static gboolean
is_formulation (const char *id)
{
  guint n;
  const HlFormulation *list = hl_formulations (&n);
  for (guint i = 0; i < n; i++)
    if (g_str_equal (list[i].id, id))
      return TRUE;
  return FALSE;
}

static gboolean
read_header (HlReader *reader, JsonObject *top)
{
  JsonNode *version = hl_reader_member (top, "heatloom");
  const char *title = "", *units = "metric", *formulation = "if97";
  if (version == NULL || !hl_reader_is_number (version))
    return hl_reader_refuse_as (reader, HL_PLANT_ERROR_FOREIGN, NULL, _("this is JSON, but no Heatloom plant: the key \"heatloom\" with the version number is missing"));
  if (json_node_get_double (version) > VERSION)
    return hl_reader_refuse_as (reader, HL_PLANT_ERROR_FOREIGN, "heatloom", _("this file was made by a later version of Heatloom; update the program"));
  if (json_node_get_double (version) < VERSION)
    return hl_reader_refuse_as (reader, HL_PLANT_ERROR_FOREIGN, "heatloom", _("must be 1, the version of the file format"));
  if (!hl_reader_string (reader, top, "title", &title) || !hl_reader_string (reader, top, "units", &units)
      || !hl_reader_string (reader, top, "formulation", &formulation))
    return FALSE;
  if (!hl_unit_set_from_id (units, &reader->plant->units))
    return hl_reader_refuse (reader, "units", _("“%s” is none of “metric”, “si”, “us”"), units);
  if (!is_formulation (formulation))
    return hl_reader_refuse (reader, "formulation", _("“%s” is not known; write \"if97\" or \"iapws95\""), formulation);
  reader->plant->formulation = g_intern_string (formulation);
  g_ref_string_release (reader->plant->title);
  reader->plant->title = g_ref_string_new (title);
  return read_site (reader, top);
}

static gboolean
read_top (HlReader *reader, JsonObject *top)
{
  static const char *const known[] = { "heatloom", "title", "units", "formulation", "site", "components", "streams", "shafts", "plant", "dismissed", NULL };
  g_autoptr (GHashTable) ids = g_hash_table_new (g_str_hash, g_str_equal);
  HlPlant *plant = reader->plant;
  if (!read_header (reader, top) || !read_items (reader, top, "components", ids, read_component_item))
    return FALSE;
  hl_plant_index (plant);
  if (!read_items (reader, top, "streams", ids, read_stream) || !read_items (reader, top, "shafts", ids, read_shaft))
    return FALSE;
  hl_plant_index (plant);
  plant->extra = hl_reader_unknown (top, known, NULL);
  return read_all_values (reader, top) && hl_plant_read_dismissed (reader, top);
}

HlPlant *
hl_plant_read (const char *text, gssize length, const char *name, HlReadMore more, gpointer data, GError **error)
{
  g_autoptr (HlPlant) plant = NULL;
  g_autoptr (GHashTable) lines = NULL;
  g_autoptr (JsonNode) root = NULL;
  HlReader reader = { NULL };
  gsize size;
  g_return_val_if_fail (text != NULL, NULL);
  size = length >= 0 ? (gsize) length : strlen (text);
  name = name != NULL ? name : _("text");
  if (size > MAX_FILE)
    {
      g_set_error (error, HL_PLANT_ERROR, HL_PLANT_ERROR_FILE, _("%s: larger than %d MiB; this is no plant file"), name, MAX_FILE / 1024 / 1024);
      return NULL;
    }
  lines = g_hash_table_new_full (g_str_hash, g_str_equal, g_free, (GDestroyNotify) g_array_unref);
  reader.places = (HlJsonPlaces) { name, lines };
  reader.error = error;
  root = hl_json_parse (text, size, name, &reader.places, error);
  if (root == NULL)
    return NULL;
  plant = hl_plant_alloc ();
  hl_plant_index (plant);
  reader.plant = plant;
  if (!JSON_NODE_HOLDS_OBJECT (root))
    {
      hl_reader_refuse_as (&reader, HL_PLANT_ERROR_FOREIGN, NULL, _("this is JSON, but no Heatloom plant: it must be an object in { }"));
      return NULL;
    }
  if (!read_top (&reader, json_node_get_object (root)) || (more != NULL && !more (&reader, json_node_get_object (root), data)))
    return NULL;
  return g_steal_pointer (&plant);
}

HlPlant *
hl_plant_from_json (const char *text, gssize length, const char *name, GError **error)
{
  return hl_plant_read (text, length, name, NULL, NULL, error);
}

/* Every id of the plant with the list it stands in, as read_id() keeps them. */
static GHashTable *
ids_of (const HlPlant *plant)
{
  GHashTable *ids = g_hash_table_new (g_str_hash, g_str_equal);
  for (guint i = 0; i < plant->components->len; i++)
    g_hash_table_insert (ids, (gpointer) hl_plant_component (plant, i)->id, (gpointer) "components");
  for (guint i = 0; i < plant->streams->len; i++)
    g_hash_table_insert (ids, (gpointer) hl_plant_stream (plant, i)->id, (gpointer) "streams");
  for (guint i = 0; i < plant->shafts->len; i++)
    g_hash_table_insert (ids, (gpointer) hl_plant_shaft (plant, i)->id, (gpointer) "shafts");
  return ids;
}

/* One item more, as it would stand in its list; the reader works on a copy that is thrown away where it refuses. */
HlPlant *
hl_plant_with_json_item (const HlPlant *plant, JsonObject *object, GError **error)
{
  g_autoptr (HlPlant) edited = hl_plant_share (plant);
  g_autoptr (GHashTable) ids = ids_of (plant), taken = g_hash_table_new_full (g_str_hash, g_str_equal, NULL, NULL);
  HlReader reader = { .plant = edited, .places = { .name = json_object_get_string_member_with_default (object, "id", "add") }, .error = error };
  Target target = { 0 };
  if (json_object_has_member (object, "joins"))
    {
      hl_plant_own_shafts (edited);
      for (guint i = 0; i < edited->shafts->len; i++)
        for (guint j = 0; j < hl_plant_shaft (edited, i)->n_joins; j++)
          g_hash_table_insert (taken, (gpointer) hl_plant_shaft (edited, i)->joins[j], (gpointer) hl_plant_shaft (edited, i)->id);
      if (!read_shaft (&reader, object, ids, taken))
        return NULL;
      hl_plant_index (edited);
      return g_steal_pointer (&edited);
    }
  if (json_object_has_member (object, "from"))
    {
      g_autoptr (GHashTable) ports = g_hash_table_new_full (g_str_hash, g_str_equal, g_free, NULL);
      hl_plant_own_streams (edited);
      if (!read_stream (&reader, object, ids, ports))
        return NULL;
      target = (Target) { HL_OWNER_STREAM, reader.id, &((HlStream *) edited->streams->pdata[edited->streams->len - 1])->values };
    }
  else
    {
      hl_plant_own_components (edited);
      if (!read_component (&reader, object, ids))
        return NULL;
      target = (Target) { HL_OWNER_COMPONENT, reader.id, &((HlComponent *) edited->components->pdata[edited->components->len - 1])->values };
    }
  hl_plant_index (edited);
  return read_values (&reader, object, "", &target) ? g_steal_pointer (&edited) : NULL;
}

/* A size of 0 may be a device or a pipe without an end: what is read stays within bounds all the same. */
static GByteArray *
read_within_bounds (GFile *file, GError **error)
{
  g_autoptr (GFileInputStream) stream = g_file_read (file, NULL, error);
  g_autoptr (GByteArray) bytes = g_byte_array_new ();
  guint8 block[16384];
  gssize n = 1;
  if (stream == NULL)
    return NULL;
  while (n > 0 && bytes->len <= MAX_FILE)
    {
      n = g_input_stream_read (G_INPUT_STREAM (stream), block, sizeof block, NULL, error);
      if (n < 0)
        return NULL;
      g_byte_array_append (bytes, block, (guint) n);
    }
  return g_steal_pointer (&bytes);
}

/* The bytes of a plant file; @name: (out) what messages call it. */
GByteArray *
hl_plant_load_text (const char *path, char **name_out, GError **error)
{
  g_autofree char *name = NULL;
  g_autoptr (GByteArray) text = NULL;
  g_autoptr (GError) local = NULL;
  g_autoptr (GFile) file = NULL;
  g_autoptr (GFileInfo) info = NULL;
  name = g_path_get_basename (path);
  file = g_file_new_for_path (path);
  info = g_file_query_info (file, G_FILE_ATTRIBUTE_STANDARD_SIZE "," G_FILE_ATTRIBUTE_STANDARD_TYPE, G_FILE_QUERY_INFO_NONE, NULL, &local);
  if (info != NULL && g_file_info_get_file_type (info) == G_FILE_TYPE_DIRECTORY)
    {
      g_set_error (error, HL_PLANT_ERROR, HL_PLANT_ERROR_FILE, _("%s is a folder; name a plant file"), path);
      return NULL;
    }
  if (info != NULL && g_file_info_get_size (info) > MAX_FILE)
    {
      g_set_error (error, HL_PLANT_ERROR, HL_PLANT_ERROR_FILE, _("%s: larger than %d MiB; this is no plant file"), name, MAX_FILE / 1024 / 1024);
      return NULL;
    }
  if (info == NULL || (text = read_within_bounds (file, &local)) == NULL)
    {
      g_set_error (error, HL_PLANT_ERROR, HL_PLANT_ERROR_FILE, _("%s could not be read: %s"), path, local->message);
      return NULL;
    }
  g_byte_array_append (text, (const guint8 *) "", 1);
  *name_out = g_steal_pointer (&name);
  return g_steal_pointer (&text);
}

HlPlant *
hl_plant_load (const char *path, GError **error)
{
  g_autofree char *name = NULL;
  g_autoptr (GByteArray) text = NULL;
  g_return_val_if_fail (path != NULL, NULL);
  text = hl_plant_load_text (path, &name, error);
  return text != NULL ? hl_plant_from_json ((const char *) text->data, text->len - 1, name, error) : NULL;
}
