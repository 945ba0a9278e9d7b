/* Changes: making, reading, comparing, and telling them in words.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "plant/change-private.h"
#include "plant/i18n.h"
#include <string.h>

#define MAX_WHERE 256

struct _HlChange {
  gatomicrefcount ref_count;
  HlChangeKind    kind;
  char           *where;      /* address of what is set, id of what is removed or added */
  char           *owner;      /* id in @where; "" for the plant */
  JsonObject     *object;     /* as in the file; never changed */
};

static const char *const words[] = { "set", "remove", "add" };

/* Making */

static HlChange *
change_new (HlChangeKind kind, const char *where, JsonObject *object)
{
  HlChange *change = g_new0 (HlChange, 1);
  gboolean is_stream;
  g_autofree char *key = NULL;
  g_atomic_ref_count_init (&change->ref_count);
  change->kind = kind;
  change->where = g_strdup (where);
  change->object = object;
  if (kind != HL_CHANGE_SET)
    change->owner = g_strdup (where);
  else if (!hl_change_split (where, &is_stream, &change->owner, &key) || g_str_equal (change->owner, "plant"))
    {
      g_free (change->owner);
      change->owner = g_strdup ("");
    }
  return change;
}

HlChange *
hl_change_new_set (const char *where, JsonNode *to, const char *origin)
{
  JsonObject *object = json_object_new ();
  json_object_set_string_member (object, "set", where);
  json_object_set_member (object, "to", to);
  if (origin != NULL)
    json_object_set_string_member (object, "origin", origin);
  return change_new (HL_CHANGE_SET, where, object);
}

HlChange *
hl_change_new_remove (const char *id)
{
  JsonObject *object = json_object_new ();
  json_object_set_string_member (object, "remove", id);
  return change_new (HL_CHANGE_REMOVE, id, object);
}

HlChange *
hl_change_new_add (JsonObject *item)
{
  JsonObject *object = json_object_new ();
  g_autofree char *id = g_strdup (json_object_get_string_member_with_default (item, "id", ""));
  json_object_set_object_member (object, "add", item);
  return change_new (HL_CHANGE_ADD, id, object);
}

HlChange *
hl_change_ref (HlChange *change)
{
  g_return_val_if_fail (change != NULL, NULL);
  g_atomic_ref_count_inc (&change->ref_count);
  return change;
}

void
hl_change_unref (HlChange *change)
{
  if (change == NULL || !g_atomic_ref_count_dec (&change->ref_count))
    return;
  g_free (change->where);
  g_free (change->owner);
  json_object_unref (change->object);
  g_free (change);
}

/* Parts */

HlChangeKind
hl_change_kind (const HlChange *change)
{
  g_return_val_if_fail (change != NULL, HL_CHANGE_SET);
  return change->kind;
}

const char *
hl_change_where (const HlChange *change)
{
  g_return_val_if_fail (change != NULL, NULL);
  return change->where;
}

const char *
hl_change_owner (const HlChange *change)
{
  g_return_val_if_fail (change != NULL, NULL);
  return change->owner;
}

JsonNode *
hl_change_to (const HlChange *change)
{
  return change->kind == HL_CHANGE_SET ? json_object_get_member (change->object, "to") : NULL;
}

const char *
hl_change_origin (const HlChange *change)
{
  return json_object_get_string_member_with_default (change->object, "origin", NULL);
}

JsonObject *
hl_change_item (const HlChange *change)
{
  return change->kind == HL_CHANGE_ADD ? json_object_get_object_member (change->object, "add") : NULL;
}

gboolean
hl_change_split (const char *where, gboolean *is_stream, char **id, char **key)
{
  const char *colon = strchr (where, ':'), *dot;
  *is_stream = colon != NULL;
  if (colon != NULL && strncmp (where, "stream:", 7) != 0)     /* "m:1" */
    {
      *key = g_strndup (where, (gsize) (colon - where));
      *id = g_strdup (colon + 1);
      return TRUE;
    }
  where = colon != NULL ? colon + 1 : where;
  dot = strchr (where, '.');
  if (dot == NULL || dot == where || dot[1] == '\0')
    return FALSE;
  *id = g_strndup (where, (gsize) (dot - where));
  *key = g_strdup (dot + 1);
  return TRUE;
}

gboolean
hl_is_component_look (const char *key)
{
  return g_str_equal (key, "at") || g_str_equal (key, "turn") || g_str_equal (key, "mirror");
}

gboolean
hl_is_stream_look (const char *key)
{
  return g_str_equal (key, "route") || g_str_equal (key, "label");
}

gboolean
hl_change_is_look (const HlChange *change)
{
  gboolean is_stream;
  g_autofree char *id = NULL, *key = NULL;
  g_return_val_if_fail (change != NULL, FALSE);
  return change->kind == HL_CHANGE_SET && hl_change_split (change->where, &is_stream, &id, &key)
         && (hl_is_component_look (key) || hl_is_stream_look (key));
}

gboolean
hl_change_equal (const HlChange *a, const HlChange *b)
{
  return a == b
         || (a->kind == b->kind && g_str_equal (a->where, b->where) && hl_json_object_equal (a->object, b->object));
}

gboolean
hl_change_says (const HlChange *a, const HlChange *b)
{
  JsonObjectIter iter;
  const char *key;
  JsonNode *node;
  if (a->kind != b->kind || !g_str_equal (a->where, b->where))
    return FALSE;
  json_object_iter_init (&iter, a->object);
  while (json_object_iter_next (&iter, &key, &node))
    {
      g_autoptr (GString) first = g_string_new (NULL), second = g_string_new (NULL);
      if (!json_object_has_member (b->object, key))
        return FALSE;
      hl_json_append_node (first, node);
      hl_json_append_node (second, json_object_get_member (b->object, key));
      if (!g_string_equal (first, second))
        return FALSE;
    }
  return a->kind != HL_CHANGE_SET || json_object_has_member (a->object, "origin") == json_object_has_member (b->object, "origin");
}

gboolean
hl_change_address (const HlChange *change, const HlPlant *plant, HlAddress *address)
{
  g_return_val_if_fail (change != NULL && plant != NULL, FALSE);
  return change->kind == HL_CHANGE_SET && hl_address_parse (change->where, plant, address, NULL);
}

/* JSON */

void
hl_change_append (GString *out, const HlChange *change)
{
  JsonNode *node = json_node_init_object (json_node_alloc (), change->object);
  hl_json_append_node (out, node);
  json_node_unref (node);
}

char *
hl_change_to_json (const HlChange *change)
{
  GString *out = g_string_new (NULL);
  g_return_val_if_fail (change != NULL, NULL);
  hl_change_append (out, change);
  return g_string_free (out, FALSE);
}

static gboolean
check_set (HlReader *reader, const char *path, JsonObject *object)
{
  const char *origin = NULL;
  JsonNode *to = hl_reader_member (object, "to");
  if (to == NULL)
    return hl_reader_refuse (reader, path, _("sets something and does not say to what; add \"to\", which is null where the quantity shall be found"));
  if (JSON_NODE_HOLDS_OBJECT (to))
    return hl_reader_refuse (reader, path, _("sets something to an object; a number, a text, a list or null can be set"));
  if (!hl_reader_string (reader, object, "origin", &origin))
    return FALSE;
  if (origin != NULL && !g_str_equal (origin, "given") && !g_str_equal (origin, "assumed"))
    return hl_reader_refuse (reader, path, _("“%s” is no origin of a changed value; it is “given” or “assumed”"), origin);
  return TRUE;
}

static gboolean
check_form (HlReader *reader, const char *path, HlChangeKind kind, JsonObject *object, JsonNode *node, const char **where)
{
  if (kind == HL_CHANGE_ADD)
    {
      JsonNode *id = JSON_NODE_HOLDS_OBJECT (node) ? hl_reader_member (json_node_get_object (node), "id") : NULL;
      if (id == NULL || !hl_reader_is_string (id))
        return hl_reader_refuse (reader, path, _("must add an object with an \"id\", as it would stand among components, streams or shafts"));
      node = id;
    }
  else if (!hl_reader_is_string (node))
    return hl_reader_refuse (reader, path, _("must name what it changes as a text, not %s"), hl_reader_type (node));
  *where = json_node_get_string (node);
  if (**where == '\0' || strlen (*where) > MAX_WHERE)
    return hl_reader_refuse (reader, path, _("must name what it changes with 1 to %d bytes"), MAX_WHERE);
  return kind != HL_CHANGE_SET || check_set (reader, path, object);
}

HlChange *
hl_change_read (HlReader *reader, const char *path, JsonNode *node)
{
  JsonObject *object;
  const char *where = NULL;
  int kind = -1;
  if (!JSON_NODE_HOLDS_OBJECT (node))
    {
      hl_reader_refuse (reader, path, _("must be an object in { }, not %s"), hl_reader_type (node));
      return NULL;
    }
  object = json_node_get_object (node);
  for (int i = 0; i < (int) G_N_ELEMENTS (words); i++)
    if (json_object_has_member (object, words[i]))
      {
        if (kind >= 0)
          {
            hl_reader_refuse (reader, path, _("holds both \"%s\" and \"%s\"; a change does one thing, so make two"), words[kind], words[i]);
            return NULL;
          }
        kind = i;
      }
  if (kind < 0)
    {
      hl_reader_refuse (reader, path, _("holds none of \"set\", \"remove\", \"add\""));
      return NULL;
    }
  if (!check_form (reader, path, (HlChangeKind) kind, object, json_object_get_member (object, words[kind]), &where))
    return NULL;
  return change_new ((HlChangeKind) kind, where, json_object_ref (object));
}

/* Words */

static char *
item_in_words (const HlPlant *plant, const char *id)
{
  const HlComponent *component = hl_plant_find_component (plant, id);
  const HlStream *stream = hl_plant_find_stream (plant, id);
  if (component != NULL && component->name[0] != '\0')
    return g_strdup_printf ("%s (%s)", id, component->name);
  if (component != NULL)
    return g_strdup_printf ("%s (%s)", id, _(component->kind->name));
  if (stream != NULL)
    return g_strdup_printf (_("stream %s"), id);
  return g_strdup (id);
}

/* Site and attributes, which are no quantities. */
static char *
describe_attribute (const char *id, const char *key, const HlPlant *plant)
{
  static const struct { const char *key, *text; } site[] = {
    { "site.altitude", N_("altitude of the site") }, { "site.ambient_T", N_("ambient temperature") },
    { "site.wet_bulb_T", N_("wet bulb temperature") }, { "site.dead_T", N_("temperature of the dead state") },
    { "site.dead_p", N_("pressure of the dead state") },
  };
  const HlComponent *component = hl_plant_find_component (plant, id);
  int option;
  for (guint i = 0; i < G_N_ELEMENTS (site); i++)
    if (g_str_equal (site[i].key, key))
      return g_strdup (_(site[i].text));
  if (g_str_equal (key, "name"))
    return g_strdup_printf (_("name of %s"), id);
  if (g_str_equal (key, "medium"))
    return g_strdup_printf (_("medium of stream %s"), id);
  if (hl_is_component_look (key) || hl_is_stream_look (key))
    return g_strdup_printf (_("place of %s in the drawing"), id);
  option = component != NULL ? hl_kind_find_option (component->kind, key) : -1;
  return option >= 0 ? g_strdup_printf ("%s: %s", id, _(component->kind->options[option].name)) : NULL;
}

char *
hl_change_describe (const HlChange *change, const HlPlant *base, const HlPlant *plant)
{
  gboolean is_stream;
  g_autofree char *id = NULL, *key = NULL, *item = NULL;
  char *words_of_it = NULL;
  HlAddress address;
  g_return_val_if_fail (change != NULL && base != NULL && plant != NULL, NULL);
  if (change->kind == HL_CHANGE_REMOVE)
    {
      item = item_in_words (base, change->where);
      return g_strdup_printf (_("without %s"), item);
    }
  if (change->kind == HL_CHANGE_ADD)
    {
      item = item_in_words (plant, change->where);
      return g_strdup_printf (_("with %s"), item);
    }
  if (hl_change_address (change, plant, &address) || hl_change_address (change, base, &address))
    words_of_it = hl_plant_describe (hl_plant_quantity_kind (plant, &address) != NULL ? plant : base, &address);
  else if (hl_change_split (change->where, &is_stream, &id, &key))
    words_of_it = describe_attribute (id, key, plant);
  return words_of_it != NULL ? words_of_it : g_strdup (change->where);
}

static char *
shown_option (const HlChange *change, const HlPlant *plant)
{
  gboolean is_stream;
  g_autofree char *id = NULL, *key = NULL;
  const HlComponent *component;
  int option, value;
  if (!hl_change_split (change->where, &is_stream, &id, &key))
    return NULL;
  component = hl_plant_find_component (plant, id);
  option = component != NULL ? hl_kind_find_option (component->kind, key) : -1;
  if (option < 0)
    return NULL;
  value = component->options[option];
  return component->kind->options[option].choice_names != NULL ? g_strdup (_(component->kind->options[option].choice_names[value]))
                                                              : g_strdup_printf ("%d", value);
}

static char *
shown_name (const HlChange *change, const HlPlant *plant)
{
  gboolean is_stream;
  g_autofree char *id = NULL, *key = NULL;
  const HlComponent *component;
  const HlStream *stream;
  if (!hl_change_split (change->where, &is_stream, &id, &key))
    return NULL;
  component = is_stream ? NULL : hl_plant_find_component (plant, id);
  stream = hl_plant_find_stream (plant, id);
  if (component != NULL && g_str_equal (key, "name"))
    return g_strdup (component->name);
  if (stream != NULL && g_str_equal (key, "medium"))
    return g_strdup (_(hl_fluid_name (hl_fluid_lookup (stream->medium))));
  return NULL;
}

/* Figures of the site in the units of the plant. */
static char *
shown_site (const HlChange *change, const HlPlant *plant)
{
  const HlSite *site = hl_plant_site (plant);
  HlUnitSet units = hl_plant_units (plant);
  const struct { const char *where; double value; HlDimension dimension; } rows[] = {
    { "plant.site.altitude", site->altitude, HL_DIMENSION_LENGTH }, { "plant.site.ambient_T", site->ambient_T, HL_DIMENSION_TEMPERATURE },
    { "plant.site.wet_bulb_T", site->wet_bulb_T, HL_DIMENSION_TEMPERATURE }, { "plant.site.dead_T", site->dead_T, HL_DIMENSION_TEMPERATURE },
    { "plant.site.dead_p", site->dead_p, HL_DIMENSION_PRESSURE },
  };
  for (guint i = 0; i < G_N_ELEMENTS (rows); i++)
    if (g_str_equal (rows[i].where, change->where))
      return hl_units_format (rows[i].value, rows[i].dimension, units);
  return NULL;
}

char *
hl_change_shown (const HlChange *change, const HlPlant *plant)
{
  HlAddress address;
  const HlValue *value;
  char *text;
  JsonNode *to;
  g_return_val_if_fail (change != NULL && plant != NULL, NULL);
  to = hl_change_to (change);
  if (to == NULL || hl_change_is_look (change))
    return g_strdup ("");
  if (hl_change_address (change, plant, &address))
    {
      value = hl_plant_value_wherever (plant, &address, NULL);
      if (value == NULL)
        return g_strdup (_("found"));
      if (value->origin != HL_ORIGIN_TIED)
        return hl_quantity_format (hl_plant_quantity_kind (plant, &address), value->value, hl_plant_units (plant));
      {
        g_autofree char *tie = hl_tie_format (plant, &address, value);
        return g_strconcat ("=", tie, NULL);
      }
    }
  if ((text = shown_option (change, plant)) != NULL || (text = shown_site (change, plant)) != NULL
      || (text = shown_name (change, plant)) != NULL)
    return text;
  return g_strdup ("");
}
