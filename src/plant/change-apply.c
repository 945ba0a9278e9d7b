/* Changes applied to a plant; what no longer fits is told, never forced.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "plant/change-private.h"
#include "plant/i18n.h"
#include <math.h>
#include <string.h>

static HlPlant *
refuse (GError **error, const char *format, ...) G_GNUC_PRINTF (2, 3);
static HlPlant *
refuse (GError **error, const char *format, ...)
{
  g_autofree char *why = NULL;
  va_list arguments;
  va_start (arguments, format);
  why = g_strdup_vprintf (format, arguments);
  va_end (arguments);
  g_set_error_literal (error, HL_PLANT_ERROR, HL_PLANT_ERROR_CONTENT, why);
  return NULL;
}

/* A reader over one member, for the checks that members of a file go through. */
static HlReader
reader_for (const char *where, GError **error)
{
  return (HlReader) { .places = { .name = where }, .error = error };
}

static JsonObject *
member_alone (const char *key, JsonNode *to)
{
  JsonObject *object = json_object_new ();
  json_object_set_member (object, key, json_node_copy (to));
  return object;
}

/* Site and formulation */

static HlPlant *
set_of_plant (const HlPlant *plant, const char *key, JsonNode *to, GError **error)
{
  static const struct { const char *key; gsize offset; double least, most; } rows[] = {
    { "site.altitude", G_STRUCT_OFFSET (HlSite, altitude), HL_SITE_LEAST_ALTITUDE, HL_SITE_MOST_ALTITUDE },
    { "site.ambient_T", G_STRUCT_OFFSET (HlSite, ambient_T), HL_SITE_LEAST_T, HL_SITE_MOST_T },
    { "site.wet_bulb_T", G_STRUCT_OFFSET (HlSite, wet_bulb_T), HL_SITE_LEAST_T, HL_SITE_MOST_T },
    { "site.dead_T", G_STRUCT_OFFSET (HlSite, dead_T), HL_SITE_LEAST_T, HL_SITE_MOST_T },
    { "site.dead_p", G_STRUCT_OFFSET (HlSite, dead_p), HL_SITE_LEAST_P, HL_SITE_MOST_P },
  };
  HlSite site = *hl_plant_site (plant);
  for (guint i = 0; i < G_N_ELEMENTS (rows); i++)
    if (g_str_equal (rows[i].key, key))
      {
        double number = hl_reader_is_number (to) ? json_node_get_double (to) : (double) NAN;
        if (!(number >= rows[i].least && number <= rows[i].most))
          return refuse (error, _("plant.%s must be a number from %g to %g (SI)"), key, rows[i].least, rows[i].most);
        *(double *) ((char *) &site + rows[i].offset) = number;
        return hl_plant_with_site (plant, &site);
      }
  return refuse (error, _("the plant has no quantity “%s”"), key);
}

/* Components and streams */

static HlPlant *
set_option (const HlPlant *plant, const HlComponent *component, guint n, JsonNode *to, GError **error)
{
  const char *key = component->kind->options[n].key;
  g_autoptr (HlComponent) wanted = hl_component_new_bare (component->kind, component->id, 0, 0);
  g_autoptr (HlComponent) copy = hl_component_copy (component);
  g_autoptr (JsonObject) object = member_alone (key, to);
  HlReader reader = reader_for (component->id, error);
  if (!hl_reader_option (&reader, object, wanted, n))
    return NULL;
  hl_component_set_option (copy, key, wanted->options[n]);
  return hl_plant_with_component (plant, g_steal_pointer (&copy));
}

static HlPlant *
set_component_attribute (const HlPlant *plant, const HlComponent *component, const char *key, JsonNode *to, GError **error)
{
  g_autoptr (HlComponent) copy = hl_component_copy (component);
  g_autoptr (JsonObject) object = member_alone (key, to);
  HlReader reader = reader_for (component->id, error);
  HlGridPoint at = { copy->x, copy->y };
  const char *name = copy->name;
  if (!hl_reader_string (&reader, object, "name", &name) || !hl_reader_point (&reader, object, "at", &at)
      || !hl_reader_int (&reader, object, "turn", 0, 3, &copy->turn) || !hl_reader_boolean (&reader, object, "mirror", &copy->is_mirrored))
    return NULL;
  if (name != copy->name)
    hl_component_set_name (copy, name);
  copy->x = at.x;
  copy->y = at.y;
  return hl_plant_with_component (plant, g_steal_pointer (&copy));
}

static HlPlant *
set_stream_attribute (const HlPlant *plant, const HlStream *stream, const char *key, JsonNode *to, GError **error)
{
  g_autoptr (HlStream) copy = hl_stream_copy (stream);
  g_autoptr (JsonObject) object = member_alone (key, to);
  HlReader reader = reader_for (stream->id, error);
  const char *medium = copy->medium;
  if (g_str_equal (key, "label") && JSON_NODE_HOLDS_NULL (to))
    copy->has_label_place = FALSE;
  else if (g_str_equal (key, "label") && !hl_reader_label (&reader, object, copy))
    return NULL;
  else if (g_str_equal (key, "route") && !hl_reader_route (&reader, object, copy))
    return NULL;
  if (!hl_reader_string (&reader, object, "medium", &medium))
    return NULL;
  if (hl_fluid_lookup (medium) == NULL)
    return refuse (error, _("“%s” is no medium that is known here"), medium);
  copy->medium = g_intern_string (medium);
  return hl_plant_with_stream (plant, g_steal_pointer (&copy));
}

/* Quantities */

static HlPlant *
set_quantity (const HlPlant *plant, const char *where, JsonNode *to, const char *origin, GError **error)
{
  HlAddress address;
  HlValue value = { .origin = g_strcmp0 (origin, "assumed") == 0 ? HL_ORIGIN_ASSUMED : HL_ORIGIN_GIVEN };
  if (!hl_address_parse (where, plant, &address, error))
    return NULL;
  if (JSON_NODE_HOLDS_NULL (to))
    return hl_plant_with_value (plant, &address, NULL, error);
  if (hl_reader_is_number (to))
    value.value = json_node_get_double (to);
  else if (!hl_reader_is_string (to))
    return refuse (error, _("%s must be a number, a tie as a text, or null, not %s"), where, hl_reader_type (to));
  else if (!hl_tie_read (plant, &address, json_node_get_string (to), TRUE, &value, error))
    return NULL;
  return hl_plant_with_value (plant, &address, &value, error);
}

static HlPlant *
apply_set (const HlChange *change, const HlPlant *plant, GError **error)
{
  JsonNode *to = hl_change_to (change);
  const char *where = hl_change_where (change);
  gboolean is_stream;
  g_autofree char *id = NULL, *key = NULL;
  const HlComponent *component;
  const HlStream *stream;
  if (!hl_change_split (where, &is_stream, &id, &key))
    return set_quantity (plant, where, to, hl_change_origin (change), error);
  if (g_str_equal (id, "plant") && !is_stream && g_str_has_prefix (key, "site."))
    return set_of_plant (plant, key, to, error);
  component = is_stream ? NULL : hl_plant_find_component (plant, id);
  stream = hl_plant_find_stream (plant, id);
  if (component != NULL && hl_kind_find_option (component->kind, key) >= 0)
    return set_option (plant, component, (guint) hl_kind_find_option (component->kind, key), to, error);
  if (component != NULL && (hl_is_component_look (key) || g_str_equal (key, "name")))
    return set_component_attribute (plant, component, key, to, error);
  if (stream != NULL && (hl_is_stream_look (key) || g_str_equal (key, "medium")))
    return set_stream_attribute (plant, stream, key, to, error);
  return set_quantity (plant, where, to, hl_change_origin (change), error);
}

static gboolean
has_item (const HlPlant *plant, const char *id)
{
  if (hl_plant_find_component (plant, id) != NULL || hl_plant_find_stream (plant, id) != NULL)
    return TRUE;
  for (guint i = 0; i < hl_plant_n_shafts (plant); i++)
    if (g_str_equal (hl_plant_shaft (plant, i)->id, id))
      return TRUE;
  return FALSE;
}

HlPlant *
hl_change_apply (const HlChange *change, const HlPlant *plant, GError **error)
{
  const char *ids[2] = { hl_change_where (change), NULL };
  g_return_val_if_fail (change != NULL && plant != NULL, NULL);
  switch (hl_change_kind (change))
    {
    case HL_CHANGE_SET:
      return apply_set (change, plant, error);
    case HL_CHANGE_ADD:
      return hl_plant_with_json_item (plant, hl_change_item (change), error);
    case HL_CHANGE_REMOVE:
    default:
      return has_item (plant, ids[0]) ? hl_plant_without (plant, ids) : refuse (error, _("there is no %s to be removed"), ids[0]);
    }
}

static void
unapplied_free (gpointer data)
{
  HlUnapplied *unapplied = data;
  hl_change_unref (unapplied->change);
  g_free (unapplied->why);
  g_free (unapplied);
}

GPtrArray *
hl_unapplied_list (void)
{
  return g_ptr_array_new_with_free_func (unapplied_free);
}

HlPlant *
hl_changes_apply (const GPtrArray *changes, const HlPlant *plant, GPtrArray *unapplied)
{
  HlPlant *edited = hl_plant_ref ((HlPlant *) plant);
  for (guint i = 0; i < changes->len; i++)
    {
      g_autoptr (GError) error = NULL;
      HlPlant *next = hl_change_apply (changes->pdata[i], edited, &error);
      if (next != NULL)
        {
          hl_plant_unref (edited);
          edited = next;
        }
      else if (unapplied != NULL)
        {
          HlUnapplied *left_out = g_new (HlUnapplied, 1);
          *left_out = (HlUnapplied) { hl_change_ref (changes->pdata[i]), g_strdup (error != NULL ? error->message : "") };
          g_ptr_array_add (unapplied, left_out);
        }
    }
  return edited;
}
