/* New ids for what is there: lines, shafts and ties follow.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "plant/plant-private.h"
#include "plant/i18n.h"

/* --- ties -------------------------------------------------------------------------- */

/* Maps the ties in a list; where @plant has not what one names then, or it does not fit, the value is found. */
static gboolean
map_values (const HlPlant *plant, HlOwner owner, const char *id, HlValues *values, HlTieMap map, gpointer data, gboolean keeps_broken)
{
  gboolean is_changed = FALSE;
  for (guint k = values->n; k-- > 0;)
    {
      HlValue value = values->entries[k].value, read;
      HlAddress address = { owner, id, values->entries[k].key };
      if (value.origin != HL_ORIGIN_TIED)
        continue;
      value.tie = hl_tie_mapped (value.tie, map, data);
      g_autofree char *text = hl_tie_to_text (&value);
      gboolean is_good = hl_tie_read (plant, &address, text, TRUE, &read, NULL);
      for (guint n = 0; n < hl_tie_n_of (value.tie) && is_good && !keeps_broken; n++)
        is_good = hl_plant_quantity_kind (plant, hl_tie_of (value.tie, n)) != NULL;
      if (is_good || keeps_broken)
        value.tie = is_good ? read.tie : value.tie;
      if (value.tie == values->entries[k].value.tie && (is_good || keeps_broken))
        continue;
      hl_values_set (values, address.key, is_good || keeps_broken ? &value : NULL);
      is_changed = TRUE;
    }
  return is_changed;
}

static gboolean
has_tie (const HlValues *values)
{
  for (guint k = 0; k < values->n; k++)
    if (values->entries[k].value.origin == HL_ORIGIN_TIED)
      return TRUE;
  return FALSE;
}

/* @ids: NULL for all.  Works on a plant of one's own. */
static void
map_ties (HlPlant *plant, const char *const *ids, HlTieMap map, gpointer data, gboolean keeps_broken)
{
  hl_plant_own_components (plant);
  hl_plant_own_streams (plant);
  for (guint i = 0; i < plant->components->len; i++)
    {
      HlComponent *component = plant->components->pdata[i];
      if (!has_tie (&component->values) || (ids != NULL && !g_strv_contains (ids, component->id)))
        continue;
      plant->components->pdata[i] = hl_component_copy (component);
      hl_component_unref (component);
      component = plant->components->pdata[i];
      map_values (plant, HL_OWNER_COMPONENT, component->id, &component->values, map, data, keeps_broken);
    }
  for (guint i = 0; i < plant->streams->len; i++)
    {
      HlStream *stream = plant->streams->pdata[i];
      if (!has_tie (&stream->values) || (ids != NULL && !g_strv_contains (ids, stream->id)))
        continue;
      plant->streams->pdata[i] = hl_stream_copy (stream);
      hl_stream_unref (stream);
      stream = plant->streams->pdata[i];
      map_values (plant, HL_OWNER_STREAM, stream->id, &stream->values, map, data, keeps_broken);
    }
  if (ids == NULL)
    map_values (plant, HL_OWNER_PLANT, g_intern_static_string (""), &plant->values, map, data, keeps_broken);
}

HlPlant *
hl_plant_with_ties_mapped (const HlPlant *plant, const char *const *ids, HlTieMap map, gpointer data)
{
  g_return_val_if_fail (plant != NULL && ids != NULL && map != NULL, NULL);
  HlPlant *edited = hl_plant_share (plant);
  map_ties (edited, ids, map, data, FALSE);
  return edited;
}

/* --- a new id ---------------------------------------------------------------------- */

typedef struct { const char *from, *to; } Renaming;

static void
rename_address (HlAddress *address, gpointer data)
{
  const Renaming *renaming = data;
  if (address->owner != HL_OWNER_PLANT && address->id == renaming->from)
    address->id = renaming->to;
}

static void
rename_ends (HlPlant *plant, const Renaming *renaming)
{
  for (guint i = 0; i < plant->streams->len; i++)
    {
      HlStream *stream = plant->streams->pdata[i];
      if (stream->from_id != renaming->from && stream->to_id != renaming->from && stream->id != renaming->from)
        continue;
      HlStream *copy = hl_stream_copy (stream);
      copy->id = copy->id == renaming->from ? renaming->to : copy->id;
      copy->from_id = copy->from_id == renaming->from ? renaming->to : copy->from_id;
      copy->to_id = copy->to_id == renaming->from ? renaming->to : copy->to_id;
      hl_stream_unref (stream);
      plant->streams->pdata[i] = copy;
    }
  for (guint i = 0; i < plant->shafts->len; i++)
    {
      HlShaft *shaft = plant->shafts->pdata[i];
      g_autofree const char **joins = g_new (const char *, shaft->n_joins + 1);
      gboolean is_changed = shaft->id == renaming->from;
      for (guint k = 0; k < shaft->n_joins; k++)
        {
          joins[k] = shaft->joins[k] == renaming->from ? renaming->to : shaft->joins[k];
          is_changed |= joins[k] != shaft->joins[k];
        }
      if (!is_changed)
        continue;
      HlShaft *copy = hl_shaft_new (shaft->id == renaming->from ? renaming->to : shaft->id, joins, shaft->n_joins);
      copy->extra = shaft->extra != NULL ? json_object_ref (shaft->extra) : NULL;
      hl_shaft_unref (shaft);
      plant->shafts->pdata[i] = copy;
    }
}

static gboolean
refuse (GError **error, const char *format, const char *text)
{
  g_autofree char *message = g_strdup_printf (format, text);
  g_set_error_literal (error, HL_PLANT_ERROR, HL_PLANT_ERROR_CONTENT, message);
  return FALSE;
}

static gboolean
check_id (const HlPlant *plant, const char *id, gboolean may_start_with_digit, GError **error)
{
  if (!hl_id_is_valid (id, may_start_with_digit))
    return refuse (error, _("“%s” is no id: an id starts with a letter and has only letters, digits and _"), id);
  if (g_hash_table_contains (plant->index->components, id) || g_hash_table_contains (plant->index->streams, id) || g_hash_table_contains (plant->index->shafts, id))
    return refuse (error, _("“%s” is the id of something else already; choose another one"), id);
  return TRUE;
}

HlPlant *
hl_plant_with_id (const HlPlant *plant, const char *id, const char *new_id, GError **error)
{
  g_return_val_if_fail (plant != NULL && id != NULL && new_id != NULL, NULL);
  gboolean is_component = g_hash_table_contains (plant->index->components, id), is_stream = g_hash_table_contains (plant->index->streams, id);
  if (!is_component && !is_stream && !g_hash_table_contains (plant->index->shafts, id))
    {
      refuse (error, _("there is no “%s” in this plant"), id);
      return NULL;
    }
  if (g_str_equal (id, new_id))
    return hl_plant_share (plant);
  if (!check_id (plant, new_id, is_stream, error))
    return NULL;
  Renaming renaming = { g_intern_string (id), g_intern_string (new_id) };
  HlPlant *edited = hl_plant_share (plant);
  hl_plant_own_components (edited);
  hl_plant_own_streams (edited);
  hl_plant_own_shafts (edited);
  if (is_component)
    {
      guint n = (guint) hl_plant_component_index (plant, id);
      HlComponent *copy = hl_component_copy (edited->components->pdata[n]);
      copy->id = renaming.to;
      hl_component_unref (edited->components->pdata[n]);
      edited->components->pdata[n] = copy;
    }
  rename_ends (edited, &renaming);
  hl_plant_index (edited);
  map_ties (edited, NULL, rename_address, &renaming, TRUE);
  hl_plant_map_dismissed (edited, rename_address, &renaming);
  return edited;
}
