/* Edits: each makes a new plant that shares what it did not change.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "plant/plant-private.h"
#include "plant/i18n.h"

HlPlant *
hl_plant_with_title (const HlPlant *plant, const char *title)
{
  HlPlant *edited;
  g_return_val_if_fail (plant != NULL && title != NULL, NULL);
  edited = hl_plant_share (plant);
  g_ref_string_release (edited->title);
  edited->title = g_ref_string_new (title);
  return edited;
}

HlPlant *
hl_plant_with_units (const HlPlant *plant, HlUnitSet units)
{
  HlPlant *edited;
  g_return_val_if_fail (plant != NULL && (guint) units < HL_N_UNIT_SETS, NULL);
  edited = hl_plant_share (plant);
  edited->units = units;
  return edited;
}

HlPlant *
hl_plant_with_site (const HlPlant *plant, const HlSite *site)
{
  HlPlant *edited;
  g_return_val_if_fail (plant != NULL && site != NULL, NULL);
  edited = hl_plant_share (plant);
  edited->site = *site;
  return edited;
}

/* These two take @item, into an own list. */
static void
replace_component (HlPlant *plant, guint n, HlComponent *item)
{
  hl_component_unref (plant->components->pdata[n]);
  plant->components->pdata[n] = item;
}

static void
replace_stream (HlPlant *plant, guint n, HlStream *item)
{
  hl_stream_unref (plant->streams->pdata[n]);
  plant->streams->pdata[n] = item;
}

static gboolean
has_port (const HlPlant *plant, const char *id, const char *key, HlPortDirection direction)
{
  const HlComponent *component = hl_plant_find_component (plant, id);
  guint n;
  return component != NULL && hl_component_find_port (component, key, &n)
         && hl_component_port (component, n).kind->direction == direction;
}

/* Streams whose ends are gone go too.  Needs an index; leaves one that fits. */
static void
drop_loose_streams (HlPlant *plant)
{
  gboolean owned = FALSE;
  for (guint i = plant->streams->len; i-- > 0;)
    {
      const HlStream *stream = plant->streams->pdata[i];
      if (has_port (plant, stream->from_id, stream->from_port, HL_PORT_OUT)
          && has_port (plant, stream->to_id, stream->to_port, HL_PORT_IN))
        continue;
      if (!owned)
        hl_plant_own_streams (plant);
      owned = TRUE;
      g_ptr_array_remove_index (plant->streams, i);
    }
  if (owned)
    hl_plant_index (plant);
}

static gboolean
id_is_taken (const HlPlant *plant, const char *id)
{
  return g_hash_table_contains (plant->index->components, id) || g_hash_table_contains (plant->index->streams, id)
         || g_hash_table_contains (plant->index->shafts, id);
}

/* Whether the same ports and quantities exist, so that nothing elsewhere can have lost its end. */
static gboolean
same_shape (const HlComponent *a, const HlComponent *b)
{
  if (a->kind != b->kind)
    return FALSE;
  for (guint i = 0; i < a->kind->n_options; i++)
    if (a->options[i] != b->options[i])
      return FALSE;
  return TRUE;
}

HlPlant *
hl_plant_with_component (const HlPlant *plant, HlComponent *component)
{
  HlPlant *edited;
  int n;
  gboolean keeps_shape;
  g_return_val_if_fail (plant != NULL && component != NULL && hl_id_is_valid (component->id, FALSE), NULL);
  n = hl_plant_component_index (plant, component->id);
  g_return_val_if_fail (n >= 0 || !id_is_taken (plant, component->id), NULL);
  edited = hl_plant_share (plant);
  hl_plant_own_components (edited);
  if (n < 0)
    {
      g_ptr_array_add (edited->components, component);
      hl_plant_index (edited);
      return edited;
    }
  keeps_shape = same_shape (edited->components->pdata[n], component);
  replace_component (edited, (guint) n, component);
  if (!keeps_shape)
    drop_loose_streams (edited);
  return edited;
}

HlPlant *
hl_plant_with_stream (const HlPlant *plant, HlStream *stream)
{
  HlPlant *edited;
  gboolean placed = FALSE;
  int n;
  g_return_val_if_fail (plant != NULL && stream != NULL && hl_id_is_valid (stream->id, TRUE), NULL);
  g_return_val_if_fail (has_port (plant, stream->from_id, stream->from_port, HL_PORT_OUT)
                        && has_port (plant, stream->to_id, stream->to_port, HL_PORT_IN), NULL);
  n = hl_plant_stream_index (plant, stream->id);
  g_return_val_if_fail (n >= 0 || !id_is_taken (plant, stream->id), NULL);
  edited = hl_plant_share (plant);
  hl_plant_own_streams (edited);
  for (guint i = edited->streams->len; i-- > 0;)
    {
      const HlStream *other = edited->streams->pdata[i];
      if (other->id == stream->id)
        {
          replace_stream (edited, i, stream);
          placed = TRUE;
        }
      else if ((other->from_id == stream->from_id && other->from_port == stream->from_port)
               || (other->to_id == stream->to_id && other->to_port == stream->to_port))
        g_ptr_array_remove_index (edited->streams, i);
    }
  if (!placed)
    g_ptr_array_add (edited->streams, stream);
  hl_plant_index (edited);
  return edited;
}

/* Takes a component off its shaft; a shaft left with less than two joins nothing and goes. */
static void
leave_shaft (GPtrArray *shafts, const char *component_id, const HlShaft *except)
{
  for (guint i = shafts->len; i-- > 0;)
    {
      HlShaft *shaft = shafts->pdata[i], *left;
      gboolean joins = FALSE;
      for (guint j = 0; j < shaft->n_joins; j++)
        joins = joins || shaft->joins[j] == component_id;
      if (!joins || shaft == except)
        continue;
      left = hl_shaft_copy_without (shaft, component_id);
      if (left->n_joins < 2)
        {
          hl_shaft_unref (left);
          g_ptr_array_remove_index (shafts, i);
          continue;
        }
      hl_shaft_unref (shaft);
      shafts->pdata[i] = left;
    }
}

HlPlant *
hl_plant_with_shaft (const HlPlant *plant, HlShaft *shaft)
{
  HlPlant *edited;
  gboolean placed = FALSE;
  g_return_val_if_fail (plant != NULL && shaft != NULL && hl_id_is_valid (shaft->id, FALSE), NULL);
  g_return_val_if_fail (g_hash_table_contains (plant->index->shafts, shaft->id) || !id_is_taken (plant, shaft->id), NULL);
  for (guint i = 0; i < shaft->n_joins; i++)
    {
      const HlComponent *component = hl_plant_find_component (plant, shaft->joins[i]);
      g_return_val_if_fail (component != NULL && component->kind->shaft != HL_SHAFT_NONE, NULL);
    }
  edited = hl_plant_share (plant);
  hl_plant_own_shafts (edited);
  for (guint i = 0; i < edited->shafts->len; i++)
    if (((HlShaft *) edited->shafts->pdata[i])->id == shaft->id)
      {
        hl_shaft_unref (edited->shafts->pdata[i]);
        edited->shafts->pdata[i] = shaft;
        placed = TRUE;
      }
  if (!placed)
    g_ptr_array_add (edited->shafts, shaft);
  for (guint i = 0; i < shaft->n_joins; i++)
    leave_shaft (edited->shafts, shaft->joins[i], shaft);
  hl_plant_index (edited);
  return edited;
}

HlPlant *
hl_plant_without (const HlPlant *plant, const char *const *ids)
{
  HlPlant *edited;
  g_autoptr (GHashTable) gone = NULL;
  g_return_val_if_fail (plant != NULL && ids != NULL, NULL);
  gone = g_hash_table_new (g_str_hash, g_str_equal);
  for (guint i = 0; ids[i] != NULL; i++)
    g_hash_table_add (gone, (gpointer) ids[i]);
  edited = hl_plant_share (plant);
  hl_plant_own_components (edited);
  hl_plant_own_streams (edited);
  hl_plant_own_shafts (edited);
  for (guint i = edited->shafts->len; i-- > 0;)
    if (g_hash_table_contains (gone, ((HlShaft *) edited->shafts->pdata[i])->id))
      g_ptr_array_remove_index (edited->shafts, i);
  for (guint i = edited->streams->len; i-- > 0;)
    if (g_hash_table_contains (gone, ((HlStream *) edited->streams->pdata[i])->id))
      g_ptr_array_remove_index (edited->streams, i);
  for (guint i = edited->components->len; i-- > 0;)
    {
      const char *id = ((HlComponent *) edited->components->pdata[i])->id;
      if (!g_hash_table_contains (gone, id))
        continue;
      leave_shaft (edited->shafts, id, NULL);
      g_ptr_array_remove_index (edited->components, i);
    }
  hl_plant_index (edited);
  drop_loose_streams (edited);
  hl_plant_forget_dismissed (edited);
  return edited;
}

/* The dimensions agree, as far as what it names is there.  @tie: (inout) comes out as a file of this plant would give it. */
static gboolean
check_tie (const HlPlant *plant, const HlAddress *address, const HlTie **tie, GError **error)
{
  HlValue whole = { .origin = HL_ORIGIN_TIED, .tie = *tie }, read;
  g_autofree char *text = hl_tie_to_text (&whole);
  if (!hl_tie_read (plant, address, text, TRUE, &read, error))
    return FALSE;
  *tie = read.tie;
  return TRUE;
}

static gboolean
check_value (const HlPlant *plant, const HlAddress *address, HlValue *value, GError **error)
{
  const HlQuantityKind *kind = hl_plant_quantity_kind (plant, address);
  g_autofree char *where = hl_address_to_text (address);
  if (kind == NULL)
    {
      g_set_error (error, HL_PLANT_ERROR, HL_PLANT_ERROR_ADDRESS, _("There is no quantity %s in this plant"), where);
      return FALSE;
    }
  if (value == NULL)
    return TRUE;
  if (value->origin == HL_ORIGIN_TIED)
    return check_tie (plant, address, &value->tie, error);
  g_return_val_if_fail (value->origin == HL_ORIGIN_GIVEN || value->origin == HL_ORIGIN_ASSUMED, FALSE);
  return hl_quantity_check (kind, where, value->value, plant->units, error);
}

/* Sets or removes without any check, in the copy of one owner. */
static void
store (HlPlant *plant, const HlAddress *address, const HlValue *value)
{
  if (value == NULL && hl_plant_value (plant, address) == NULL)
    return;
  if (address->owner == HL_OWNER_PLANT)
    hl_values_set (&plant->values, address->key, value);
  else if (address->owner == HL_OWNER_STREAM)
    {
      guint n = (guint) hl_plant_stream_index (plant, address->id);
      HlStream *copy = hl_stream_copy (plant->streams->pdata[n]);
      hl_values_set (&copy->values, address->key, value);
      hl_plant_own_streams (plant);
      replace_stream (plant, n, copy);
    }
  else
    {
      guint n = (guint) hl_plant_component_index (plant, address->id);
      HlComponent *copy = hl_component_copy (plant->components->pdata[n]);
      hl_values_set (&copy->values, address->key, value);
      hl_plant_own_components (plant);
      replace_component (plant, n, copy);
    }
}

HlPlant *
hl_plant_with_value (const HlPlant *plant, const HlAddress *address, const HlValue *value, GError **error)
{
  HlPlant *edited;
  const HlStream *stream;
  const char *key = NULL;
  HlValue kept;
  g_return_val_if_fail (plant != NULL && address != NULL, NULL);
  if (value != NULL)
    kept = *value;
  value = value != NULL ? &kept : NULL;
  if (!check_value (plant, address, value != NULL ? &kept : NULL, error))
    return NULL;
  edited = hl_plant_share (plant);
  stream = hl_plant_stream_of_address (plant, address, &key);
  for (guint n = 0; stream != NULL && n <= 2; n++)
    {
      HlAddress alias = hl_stream_alias (stream, key, n);
      if (!hl_address_equal (&alias, address))
        store (edited, &alias, NULL);
    }
  store (edited, address, value);
  return edited;
}

char *
hl_plant_free_id (const HlPlant *plant, const char *letter)
{
  g_return_val_if_fail (plant != NULL && letter != NULL, NULL);
  for (guint n = 1;; n++)
    {
      g_autofree char *id = g_strdup_printf ("%s%u", letter, n);
      if (!id_is_taken (plant, id) && (plant->reserved == NULL || !g_hash_table_contains (plant->reserved, g_intern_string (id))))
        return g_steal_pointer (&id);
    }
}
