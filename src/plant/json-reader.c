/* Members of JSON objects with their types checked, and refusals that say where.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "plant/json-reader.h"
#include "plant/i18n.h"
#include <math.h>
#include <string.h>

#define MAX_NAME   1000
#define MAX_GRID   1000000

gboolean
hl_reader_refuse_as (HlReader *reader, HlPlantError code, const char *key, const char *why)
{
  GString *where = g_string_new (reader->places.name);
  guint line = reader->list != NULL ? hl_json_line (&reader->places, reader->list, reader->item) : 0;
  if (line > 0)
    g_string_append_printf (where, ":%u", line);
  if (reader->list != NULL || key != NULL)
    g_string_append (where, ": ");
  if (reader->list != NULL)
    g_string_append_printf (where, "%s[%u]", reader->list, reader->item);
  if (reader->list != NULL && reader->id != NULL)
    g_string_append_printf (where, " \"%s\"", reader->id);
  if (key != NULL)
    g_string_append_printf (where, reader->list != NULL ? ".%s" : "%s", key);
  g_set_error (reader->error, HL_PLANT_ERROR, code, "%s: %s", where->str, why);
  g_string_free (where, TRUE);
  return FALSE;
}

gboolean
hl_reader_refuse (HlReader *reader, const char *key, const char *format, ...)
{
  g_autofree char *why = NULL;
  va_list arguments;
  va_start (arguments, format);
  why = g_strdup_vprintf (format, arguments);
  va_end (arguments);
  return hl_reader_refuse_as (reader, HL_PLANT_ERROR_CONTENT, key, why);
}

/* Passes on the error of a check, with the place put before it. */
gboolean
hl_reader_refuse_with (HlReader *reader, const char *key, GError *why)
{
  HlPlantError code = why->domain == HL_PLANT_ERROR ? (HlPlantError) why->code : HL_PLANT_ERROR_CONTENT;
  hl_reader_refuse_as (reader, code, key, why->message);
  g_error_free (why);
  return FALSE;
}

char *
hl_reader_clip (const char *text)
{
  g_autofree char *start = NULL;
  if (g_utf8_strlen (text, -1) <= 40)
    return g_strdup (text);
  start = g_utf8_substring (text, 0, 39);
  return g_strconcat (start, "…", NULL);
}

JsonNode *
hl_reader_member (JsonObject *object, const char *key)
{
  return object != NULL && json_object_has_member (object, key) ? json_object_get_member (object, key) : NULL;
}

const char *
hl_reader_type (JsonNode *node)
{
  switch (json_node_get_node_type (node))
    {
    case JSON_NODE_OBJECT:
      return _("an object");
    case JSON_NODE_ARRAY:
      return _("a list");
    case JSON_NODE_NULL:
      return _("null");
    case JSON_NODE_VALUE:
    default:
      return json_node_get_value_type (node) == G_TYPE_STRING ? _("a text")
             : json_node_get_value_type (node) == G_TYPE_BOOLEAN ? _("true or false") : _("a number");
    }
}

gboolean
hl_reader_is_string (JsonNode *node)
{
  return JSON_NODE_HOLDS_VALUE (node) && json_node_get_value_type (node) == G_TYPE_STRING;
}

gboolean
hl_reader_is_number (JsonNode *node)
{
  return JSON_NODE_HOLDS_VALUE (node)
         && (json_node_get_value_type (node) == G_TYPE_INT64 || json_node_get_value_type (node) == G_TYPE_DOUBLE);
}

/* These leave @result alone where the key is absent. */
gboolean
hl_reader_string (HlReader *reader, JsonObject *object, const char *key, const char **result)
{
  JsonNode *node = hl_reader_member (object, key);
  if (node == NULL)
    return TRUE;
  if (!hl_reader_is_string (node))
    return hl_reader_refuse (reader, key, _("must be a text in quotes, not %s"), hl_reader_type (node));
  if (strlen (json_node_get_string (node)) > MAX_NAME)
    return hl_reader_refuse (reader, key, _("is longer than %d bytes; shorten it"), MAX_NAME);
  *result = json_node_get_string (node);
  return TRUE;
}

gboolean
hl_reader_object (HlReader *reader, JsonObject *object, const char *key, JsonObject **result)
{
  JsonNode *node = hl_reader_member (object, key);
  if (node == NULL)
    return TRUE;
  if (!JSON_NODE_HOLDS_OBJECT (node))
    return hl_reader_refuse (reader, key, _("must be an object in { }, not %s"), hl_reader_type (node));
  *result = json_node_get_object (node);
  return TRUE;
}

gboolean
hl_reader_list (HlReader *reader, JsonObject *object, const char *key, guint most, JsonArray **result)
{
  JsonNode *node = hl_reader_member (object, key);
  if (node == NULL)
    return TRUE;
  if (!JSON_NODE_HOLDS_ARRAY (node))
    return hl_reader_refuse (reader, key, _("must be a list in [ ], not %s"), hl_reader_type (node));
  if (json_array_get_length (json_node_get_array (node)) > most)
    return hl_reader_refuse (reader, key, _("has more than %u items; split the plant"), most);
  *result = json_node_get_array (node);
  return TRUE;
}

static gboolean
node_to_int (JsonNode *node, int least, int most, int *result)
{
  double number;
  if (!hl_reader_is_number (node))
    return FALSE;
  number = json_node_get_double (node);
  if (!(number >= least && number <= most) || fabs (number - rint (number)) > 0.0)
    return FALSE;
  *result = (int) number;
  return TRUE;
}

gboolean
hl_reader_int (HlReader *reader, JsonObject *object, const char *key, int least, int most, int *result)
{
  JsonNode *node = hl_reader_member (object, key);
  if (node == NULL || node_to_int (node, least, most, result))
    return TRUE;
  return hl_reader_refuse (reader, key, _("must be a whole number from %d to %d"), least, most);
}

gboolean
hl_reader_boolean (HlReader *reader, JsonObject *object, const char *key, gboolean *result)
{
  JsonNode *node = hl_reader_member (object, key);
  if (node == NULL)
    return TRUE;
  if (!JSON_NODE_HOLDS_VALUE (node) || json_node_get_value_type (node) != G_TYPE_BOOLEAN)
    return hl_reader_refuse (reader, key, _("must be true or false, not %s"), hl_reader_type (node));
  *result = json_node_get_boolean (node);
  return TRUE;
}

gboolean
hl_reader_node_to_point (JsonNode *node, HlGridPoint *point)
{
  JsonArray *pair = JSON_NODE_HOLDS_ARRAY (node) ? json_node_get_array (node) : NULL;
  return pair != NULL && json_array_get_length (pair) == 2
         && node_to_int (json_array_get_element (pair, 0), -MAX_GRID, MAX_GRID, &point->x)
         && node_to_int (json_array_get_element (pair, 1), -MAX_GRID, MAX_GRID, &point->y);
}

gboolean
hl_reader_point (HlReader *reader, JsonObject *object, const char *key, HlGridPoint *point)
{
  JsonNode *node = hl_reader_member (object, key);
  if (node == NULL || hl_reader_node_to_point (node, point))
    return TRUE;
  return hl_reader_refuse (reader, key, _("must be two whole numbers, [x, y] in grid units"));
}

/* What is not in @known, to be written back. */
JsonObject *
hl_reader_unknown (JsonObject *object, const char *const *known, const HlKind *kind)
{
  JsonObjectIter iter;
  const char *key;
  JsonNode *node;
  JsonObject *extra = NULL;
  json_object_iter_init_ordered (&iter, object);
  while (json_object_iter_next_ordered (&iter, &key, &node))
    {
      if (g_strv_contains (known, key) || (kind != NULL && hl_kind_find_option (kind, key) >= 0))
        continue;
      if (extra == NULL)
        extra = json_object_new ();
      json_object_set_member (extra, key, json_node_ref (node));
    }
  return extra;
}
