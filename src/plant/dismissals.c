/* Findings that the engineer has looked at and put aside: kept with the plant.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "plant/json-reader.h"
#include "plant/i18n.h"
#include <string.h>

#define MOST_DISMISSED 5000

static void
clear_dismissal (gpointer data)
{
  HlDismissal *dismissal = data;
  g_clear_pointer (&dismissal->extra, json_object_unref);
}

/* A list of one's own, to be changed. */
static GArray *
copy_list (const GArray *list)
{
  GArray *copy = g_array_new (FALSE, FALSE, sizeof (HlDismissal));
  g_array_set_clear_func (copy, clear_dismissal);
  for (guint k = 0; list != NULL && k < list->len; k++)
    {
      HlDismissal dismissal = g_array_index (list, HlDismissal, k);
      dismissal.extra = dismissal.extra != NULL ? json_object_ref (dismissal.extra) : NULL;
      g_array_append_val (copy, dismissal);
    }
  return copy;
}

static void
own_list (HlPlant *plant)
{
  GArray *own = copy_list (plant->dismissed);
  g_clear_pointer (&plant->dismissed, g_array_unref);
  plant->dismissed = own;
}

static int
find (const HlPlant *plant, const char *code, const HlAddress *at)
{
  for (guint k = 0; plant->dismissed != NULL && k < plant->dismissed->len; k++)
    {
      const HlDismissal *dismissal = &g_array_index (plant->dismissed, HlDismissal, k);
      if (g_str_equal (dismissal->code, code) && dismissal->at.owner == at->owner && g_str_equal (dismissal->at.id, at->id)
          && g_str_equal (dismissal->at.key, at->key))
        return (int) k;
    }
  return -1;
}

guint
hl_plant_n_dismissed (const HlPlant *plant)
{
  return plant->dismissed != NULL ? plant->dismissed->len : 0;
}

const HlDismissal *
hl_plant_dismissed (const HlPlant *plant, guint n)
{
  g_return_val_if_fail (n < hl_plant_n_dismissed (plant), NULL);
  return &g_array_index (plant->dismissed, HlDismissal, n);
}

gboolean
hl_plant_is_dismissed (const HlPlant *plant, const char *code, const HlAddress *at)
{
  g_return_val_if_fail (plant != NULL && code != NULL && at != NULL, FALSE);
  return find (plant, code, at) >= 0;
}

HlPlant *
hl_plant_with_dismissed (const HlPlant *plant, const char *code, const HlAddress *at, gboolean is_dismissed)
{
  g_return_val_if_fail (plant != NULL && code != NULL && at != NULL, NULL);
  HlPlant *edited = hl_plant_share (plant);
  int n = find (plant, code, at);
  if ((n >= 0) == !!is_dismissed)
    return edited;
  own_list (edited);
  if (n >= 0)
    g_array_remove_index (edited->dismissed, (guint) n);
  else
    {
      HlDismissal dismissal = { g_intern_string (code), { at->owner, g_intern_string (at->id), g_intern_string (at->key) }, NULL };
      g_array_append_val (edited->dismissed, dismissal);
    }
  return edited;
}

/* What is gone has no findings any more. */
void
hl_plant_forget_dismissed (HlPlant *plant)
{
  gboolean is_own = FALSE;
  for (guint k = hl_plant_n_dismissed (plant); k-- > 0;)
    {
      const HlAddress *at = &hl_plant_dismissed (plant, k)->at;
      gboolean is_there = at->owner == HL_OWNER_PLANT
                          || (at->owner == HL_OWNER_STREAM ? hl_plant_find_stream (plant, at->id) != NULL : hl_plant_find_component (plant, at->id) != NULL);
      if (is_there)
        continue;
      if (!is_own)
        own_list (plant);
      is_own = TRUE;
      g_array_remove_index (plant->dismissed, k);
    }
}

void
hl_plant_map_dismissed (HlPlant *plant, HlTieMap map, gpointer data)
{
  if (hl_plant_n_dismissed (plant) == 0)
    return;
  own_list (plant);
  for (guint k = 0; k < plant->dismissed->len; k++)
    map (&g_array_index (plant->dismissed, HlDismissal, k).at, data);
}

gboolean
hl_dismissals_equal (const HlPlant *a, const HlPlant *b)
{
  guint n = hl_plant_n_dismissed (a);
  if (a->dismissed == b->dismissed)
    return TRUE;
  if (n != hl_plant_n_dismissed (b))
    return FALSE;
  for (guint k = 0; k < n; k++)
    {
      const HlDismissal *one = hl_plant_dismissed (a, k), *other = hl_plant_dismissed (b, k);
      if (one->code != other->code || !hl_address_equal (&one->at, &other->at) || !hl_json_object_equal (one->extra, other->extra))
        return FALSE;
    }
  return TRUE;
}

/* --- in the file ------------------------------------------------------------------- */

/* "T1.exhaust_moisture", "m:3"; a finding about the whole says "T1", "stream:3" or "plant". */
char *
hl_dismissal_at_to_text (const HlAddress *at)
{
  if (*at->key != '\0')
    return hl_address_to_text (at);
  return at->owner == HL_OWNER_PLANT ? g_strdup ("plant") : at->owner == HL_OWNER_STREAM ? g_strdup_printf ("stream:%s", at->id) : g_strdup (at->id);
}

static gboolean
read_at (const char *text, HlAddress *at, GError **error)
{
  const char *colon = strchr (text, ':');
  if (strchr (text, '.') != NULL || (colon != NULL && !g_str_has_prefix (text, "stream:")))
    return hl_address_parse (text, NULL, at, error);
  const char *id = colon != NULL ? colon + 1 : text;
  if (!g_str_equal (text, "plant") && !hl_id_is_valid (id, colon != NULL))
    {
      g_set_error (error, HL_PLANT_ERROR, HL_PLANT_ERROR_CONTENT, _("“%s” is no id: an id starts with a letter and has only letters, digits and _"), id);
      return FALSE;
    }
  *at = g_str_equal (text, "plant") ? hl_address_plant ("") : colon != NULL ? hl_address_stream (id, "") : hl_address_component (id, "");
  return TRUE;
}

static gboolean
is_code (const char *text)
{
  gsize length = strlen (text);
  return length > 0 && length <= 64 && strspn (text, "abcdefghijklmnopqrstuvwxyz0123456789-") == length;
}

static gboolean
read_one (HlReader *reader, const char *path, JsonNode *node)
{
  static const char *const known[] = { "code", "at", NULL };
  const char *code = NULL, *text = NULL;
  HlAddress at;
  GError *why = NULL;
  if (!JSON_NODE_HOLDS_OBJECT (node))
    return hl_reader_refuse (reader, path, _("must be an object in { }, not %s"), hl_reader_type (node));
  JsonObject *object = json_node_get_object (node);
  if (!hl_reader_string (reader, object, "code", &code) || !hl_reader_string (reader, object, "at", &text))
    return FALSE;
  if (code == NULL || text == NULL || !is_code (code) || strlen (text) > 256)
    return hl_reader_refuse (reader, path, _("must say which finding is dismissed, and where: {\"code\": \"exhaust-moisture\", \"at\": \"T1.exhaust_moisture\"}"));
  if (!read_at (text, &at, &why))
    return hl_reader_refuse_with (reader, path, why);
  HlDismissal dismissal = { g_intern_string (code), at, hl_reader_unknown (object, known, NULL) };
  g_array_append_val (reader->plant->dismissed, dismissal);
  return TRUE;
}

gboolean
hl_plant_read_dismissed (HlReader *reader, JsonObject *top)
{
  JsonArray *list = NULL;
  if (!hl_reader_list (reader, top, "dismissed", MOST_DISMISSED, &list))
    return FALSE;
  own_list (reader->plant);
  for (guint k = 0; list != NULL && k < json_array_get_length (list); k++)
    {
      g_autofree char *path = g_strdup_printf ("dismissed[%u]", k);
      if (!read_one (reader, path, json_array_get_element (list, k)))
        return FALSE;
    }
  return TRUE;
}
