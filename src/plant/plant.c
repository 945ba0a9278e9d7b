/* Plants: creation, reading, look-ups.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "plant/plant-private.h"
#include "plant/i18n.h"
#include <math.h>
#include <string.h>

G_DEFINE_QUARK (hl-plant-error-quark, hl_plant_error)

static guint
port_key_hash (gconstpointer data)
{
  const HlPortKey *key = data;
  return g_str_hash (key->id) * 31u + g_str_hash (key->port);
}

static gboolean
port_key_equal (gconstpointer a, gconstpointer b)
{
  const HlPortKey *first = a, *second = b;
  return g_str_equal (first->id, second->id) && g_str_equal (first->port, second->port);
}

static void
index_unref (HlPlantIndex *index)
{
  if (index == NULL || !g_atomic_ref_count_dec (&index->ref_count))
    return;
  g_hash_table_unref (index->components);
  g_hash_table_unref (index->streams);
  g_hash_table_unref (index->shafts);
  g_hash_table_unref (index->ports);
  g_hash_table_unref (index->shaft_of);
  g_free (index->port_keys);
  g_free (index);
}

static void
add_port (HlPlantIndex *index, HlPortKey *key, const char *id, const char *port, guint position)
{
  *key = (HlPortKey) { id, port };
  g_hash_table_insert (index->ports, key, GUINT_TO_POINTER (position + 1));
}

void
hl_plant_index (HlPlant *plant)
{
  HlPlantIndex *index = g_new0 (HlPlantIndex, 1);
  g_atomic_ref_count_init (&index->ref_count);
  index->components = g_hash_table_new (g_str_hash, g_str_equal);
  index->streams = g_hash_table_new (g_str_hash, g_str_equal);
  index->shafts = g_hash_table_new (g_str_hash, g_str_equal);
  index->ports = g_hash_table_new (port_key_hash, port_key_equal);
  index->shaft_of = g_hash_table_new (g_str_hash, g_str_equal);
  index->port_keys = g_new (HlPortKey, 2 * plant->streams->len + 1);
  for (guint i = 0; i < plant->components->len; i++)
    g_hash_table_insert (index->components, (gpointer) ((HlComponent *) plant->components->pdata[i])->id, GUINT_TO_POINTER (i + 1));
  for (guint i = 0; i < plant->streams->len; i++)
    {
      const HlStream *stream = plant->streams->pdata[i];
      g_hash_table_insert (index->streams, (gpointer) stream->id, GUINT_TO_POINTER (i + 1));
      add_port (index, &index->port_keys[2 * i], stream->from_id, stream->from_port, i);
      add_port (index, &index->port_keys[2 * i + 1], stream->to_id, stream->to_port, i);
    }
  for (guint i = 0; i < plant->shafts->len; i++)
    {
      const HlShaft *shaft = plant->shafts->pdata[i];
      g_hash_table_insert (index->shafts, (gpointer) shaft->id, GUINT_TO_POINTER (i + 1));
      for (guint j = 0; j < shaft->n_joins; j++)
        g_hash_table_insert (index->shaft_of, (gpointer) shaft->joins[j], GUINT_TO_POINTER (i + 1));
    }
  index_unref (plant->index);
  plant->index = index;
}

static GPtrArray *
list_new (GDestroyNotify unref)
{
  return g_ptr_array_new_with_free_func (unref);
}

HlPlant *
hl_plant_alloc (void)
{
  HlPlant *plant = g_new0 (HlPlant, 1);
  g_atomic_ref_count_init (&plant->ref_count);
  plant->title = g_ref_string_new ("");
  plant->formulation = g_intern_static_string ("if97");
  plant->units = HL_UNITS_METRIC;
  /* 15 °C and 1.01325 bar by ISO 2533 at sea level; the dead state by custom 25 °C and 1.01325 bar (Szargut). */
  plant->site = (HlSite) { .altitude = 0.0, .ambient_T = 288.15, .wet_bulb_T = 284.15, .dead_T = 298.15, .dead_p = 101325.0 };
  plant->components = list_new ((GDestroyNotify) hl_component_unref);
  plant->streams = list_new ((GDestroyNotify) hl_stream_unref);
  plant->shafts = list_new ((GDestroyNotify) hl_shaft_unref);
  return plant;
}

HlPlant *
hl_plant_new (void)
{
  HlPlant *plant = hl_plant_alloc ();
  guint n;
  const HlQuantityKind *kinds = hl_plant_quantities (&n);
  for (guint i = 0; i < n; i++)
    if ((kinds[i].flags & HL_QUANTITY_ASSUMED) && !isnan (kinds[i].default_value))
      {
        HlValue value = { .origin = HL_ORIGIN_ASSUMED, .value = kinds[i].default_value };
        hl_values_set (&plant->values, kinds[i].key, &value);
      }
  hl_plant_index (plant);
  return plant;
}

static JsonObject *
share_extra (JsonObject *extra)
{
  return extra != NULL ? json_object_ref (extra) : NULL;
}

HlPlant *
hl_plant_share (const HlPlant *plant)
{
  HlPlant *copy = g_memdup2 (plant, sizeof *plant);
  g_atomic_ref_count_init (&copy->ref_count);
  g_ref_string_acquire (copy->title);
  g_ptr_array_ref (copy->components);
  g_ptr_array_ref (copy->streams);
  g_ptr_array_ref (copy->shafts);
  g_atomic_ref_count_inc (&copy->index->ref_count);
  hl_values_copy (&copy->values, &plant->values);
  if (copy->dismissed != NULL)
    g_array_ref (copy->dismissed);
  share_extra (copy->extra);
  share_extra (copy->site_extra);
  share_extra (copy->plant_extra);
  if (copy->reserved != NULL)
    g_hash_table_ref (copy->reserved);
  return copy;
}

HlPlant *
hl_plant_with_reserved (const HlPlant *plant, GHashTable *reserved)
{
  HlPlant *edited = hl_plant_share (plant);
  g_clear_pointer (&edited->reserved, g_hash_table_unref);
  edited->reserved = reserved != NULL ? g_hash_table_ref (reserved) : NULL;
  return edited;
}

static gpointer
ref_component (gconstpointer item, G_GNUC_UNUSED gpointer data)
{
  return hl_component_ref ((HlComponent *) item);
}

static gpointer
ref_stream (gconstpointer item, G_GNUC_UNUSED gpointer data)
{
  return hl_stream_ref ((HlStream *) item);
}

static gpointer
ref_shaft (gconstpointer item, G_GNUC_UNUSED gpointer data)
{
  return hl_shaft_ref ((HlShaft *) item);
}

void
hl_plant_own_components (HlPlant *plant)
{
  GPtrArray *own = g_ptr_array_copy (plant->components, ref_component, NULL);
  g_ptr_array_unref (plant->components);
  plant->components = own;
}

void
hl_plant_own_streams (HlPlant *plant)
{
  GPtrArray *own = g_ptr_array_copy (plant->streams, ref_stream, NULL);
  g_ptr_array_unref (plant->streams);
  plant->streams = own;
}

void
hl_plant_own_shafts (HlPlant *plant)
{
  GPtrArray *own = g_ptr_array_copy (plant->shafts, ref_shaft, NULL);
  g_ptr_array_unref (plant->shafts);
  plant->shafts = own;
}

HlPlant *
hl_plant_ref (HlPlant *plant)
{
  g_return_val_if_fail (plant != NULL, NULL);
  g_atomic_ref_count_inc (&plant->ref_count);
  return plant;
}

void
hl_plant_unref (HlPlant *plant)
{
  if (plant == NULL || !g_atomic_ref_count_dec (&plant->ref_count))
    return;
  g_ref_string_release (plant->title);
  g_ptr_array_unref (plant->components);
  g_ptr_array_unref (plant->streams);
  g_ptr_array_unref (plant->shafts);
  index_unref (plant->index);
  hl_values_clear (&plant->values);
  g_clear_pointer (&plant->dismissed, g_array_unref);
  g_clear_pointer (&plant->extra, json_object_unref);
  g_clear_pointer (&plant->site_extra, json_object_unref);
  g_clear_pointer (&plant->plant_extra, json_object_unref);
  g_clear_pointer (&plant->reserved, g_hash_table_unref);
  g_free (plant);
}

const char *
hl_plant_title (const HlPlant *plant)
{
  g_return_val_if_fail (plant != NULL, NULL);
  return plant->title;
}

HlUnitSet
hl_plant_units (const HlPlant *plant)
{
  g_return_val_if_fail (plant != NULL, HL_UNITS_METRIC);
  return plant->units;
}

const char *
hl_plant_formulation (const HlPlant *plant)
{
  g_return_val_if_fail (plant != NULL, NULL);
  return plant->formulation;
}

const HlSite *
hl_plant_site (const HlPlant *plant)
{
  g_return_val_if_fail (plant != NULL, NULL);
  return &plant->site;
}

double
hl_plant_site_pressure (const HlPlant *plant)
{
  g_return_val_if_fail (plant != NULL, NAN);
  return hl_site_pressure (plant->site.altitude);
}

/* Position + 1, or 0. */
static guint
position (GHashTable *table, const char *id)
{
  return GPOINTER_TO_UINT (g_hash_table_lookup (table, id));
}

guint
hl_plant_n_components (const HlPlant *plant)
{
  g_return_val_if_fail (plant != NULL, 0);
  return plant->components->len;
}

const HlComponent *
hl_plant_component (const HlPlant *plant, guint n)
{
  g_return_val_if_fail (plant != NULL && n < plant->components->len, NULL);
  return plant->components->pdata[n];
}

int
hl_plant_component_index (const HlPlant *plant, const char *id)
{
  g_return_val_if_fail (plant != NULL && id != NULL, -1);
  return (int) position (plant->index->components, id) - 1;
}

const HlComponent *
hl_plant_find_component (const HlPlant *plant, const char *id)
{
  int n = hl_plant_component_index (plant, id);
  return n >= 0 ? plant->components->pdata[n] : NULL;
}

guint
hl_plant_n_streams (const HlPlant *plant)
{
  g_return_val_if_fail (plant != NULL, 0);
  return plant->streams->len;
}

const HlStream *
hl_plant_stream (const HlPlant *plant, guint n)
{
  g_return_val_if_fail (plant != NULL && n < plant->streams->len, NULL);
  return plant->streams->pdata[n];
}

int
hl_plant_stream_index (const HlPlant *plant, const char *id)
{
  g_return_val_if_fail (plant != NULL && id != NULL, -1);
  return (int) position (plant->index->streams, id) - 1;
}

const HlStream *
hl_plant_find_stream (const HlPlant *plant, const char *id)
{
  int n = hl_plant_stream_index (plant, id);
  return n >= 0 ? plant->streams->pdata[n] : NULL;
}

const HlStream *
hl_plant_stream_at (const HlPlant *plant, const char *component_id, const char *port)
{
  HlPortKey key = { component_id, port };
  guint n;
  g_return_val_if_fail (plant != NULL && component_id != NULL && port != NULL, NULL);
  n = GPOINTER_TO_UINT (g_hash_table_lookup (plant->index->ports, &key));
  return n > 0 ? plant->streams->pdata[n - 1] : NULL;
}

guint
hl_plant_n_shafts (const HlPlant *plant)
{
  g_return_val_if_fail (plant != NULL, 0);
  return plant->shafts->len;
}

const HlShaft *
hl_plant_shaft (const HlPlant *plant, guint n)
{
  g_return_val_if_fail (plant != NULL && n < plant->shafts->len, NULL);
  return plant->shafts->pdata[n];
}

const HlShaft *
hl_plant_shaft_of (const HlPlant *plant, const char *component_id)
{
  guint n;
  g_return_val_if_fail (plant != NULL && component_id != NULL, NULL);
  n = position (plant->index->shaft_of, component_id);
  return n > 0 ? plant->shafts->pdata[n - 1] : NULL;
}

const HlValues *
hl_plant_values (const HlPlant *plant)
{
  g_return_val_if_fail (plant != NULL, NULL);
  return &plant->values;
}

const HlValue *
hl_plant_value (const HlPlant *plant, const HlAddress *address)
{
  const HlComponent *component;
  const HlStream *stream;
  g_return_val_if_fail (plant != NULL && address != NULL, NULL);
  switch (address->owner)
    {
    case HL_OWNER_PLANT:
      return hl_values_find (&plant->values, address->key);
    case HL_OWNER_STREAM:
      stream = hl_plant_find_stream (plant, address->id);
      return stream != NULL ? hl_values_find (&stream->values, address->key) : NULL;
    case HL_OWNER_COMPONENT:
    default:
      component = hl_plant_find_component (plant, address->id);
      return component != NULL ? hl_values_find (&component->values, address->key) : NULL;
    }
}

const HlQuantityKind *
hl_plant_quantity_kind (const HlPlant *plant, const HlAddress *address)
{
  const HlComponent *component;
  g_return_val_if_fail (plant != NULL && address != NULL, NULL);
  switch (address->owner)
    {
    case HL_OWNER_PLANT:
      return hl_plant_quantity_lookup (address->key);
    case HL_OWNER_STREAM:
      return hl_plant_find_stream (plant, address->id) != NULL ? hl_stream_quantity_lookup (address->key) : NULL;
    case HL_OWNER_COMPONENT:
    default:
      component = hl_plant_find_component (plant, address->id);
      return component != NULL ? hl_component_quantity_kind (component, address->key) : NULL;
    }
}

const HlStream *
hl_plant_stream_of_address (const HlPlant *plant, const HlAddress *address, const char **key)
{
  const char *dot;
  char port[64];
  if (address->owner == HL_OWNER_PLANT)
    return NULL;
  if (address->owner == HL_OWNER_STREAM)
    {
      *key = address->key;
      return hl_plant_find_stream (plant, address->id);
    }
  dot = strrchr (address->key, '.');
  if (dot == NULL || (gsize) (dot - address->key) >= sizeof port)
    return NULL;
  memcpy (port, address->key, (gsize) (dot - address->key));
  port[dot - address->key] = '\0';
  *key = g_intern_string (dot + 1);
  return hl_plant_stream_at (plant, address->id, port);
}

HlAddress
hl_stream_alias (const HlStream *stream, const char *key, guint n)
{
  char port_key[80];
  if (n == 0)
    return (HlAddress) { HL_OWNER_STREAM, stream->id, g_intern_string (key) };
  g_snprintf (port_key, sizeof port_key, "%s.%s", n == 1 ? stream->from_port : stream->to_port, key);
  return (HlAddress) { HL_OWNER_COMPONENT, n == 1 ? stream->from_id : stream->to_id, g_intern_string (port_key) };
}

gboolean
hl_addresses_same (const HlPlant *plant, const HlAddress *a, const HlAddress *b)
{
  const char *key_a = NULL, *key_b = NULL;
  const HlStream *stream_a, *stream_b;
  if (hl_address_equal (a, b))
    return TRUE;
  stream_a = hl_plant_stream_of_address (plant, a, &key_a);
  stream_b = hl_plant_stream_of_address (plant, b, &key_b);
  return stream_a != NULL && stream_a == stream_b && g_str_equal (key_a, key_b);
}

/* Looks in the lists without interning, as this is asked for every state of every stream. */
const HlValue *
hl_plant_state_value (const HlPlant *plant, const HlStream *stream, const char *key, HlAddress *where)
{
  const HlValue *value;
  g_return_val_if_fail (plant != NULL && stream != NULL && key != NULL, NULL);
  value = hl_values_find (&stream->values, key);
  if (value != NULL && where != NULL)
    *where = hl_stream_alias (stream, key, 0);
  for (guint n = 1; value == NULL && n <= 2; n++)
    {
      const HlComponent *component = hl_plant_find_component (plant, n == 1 ? stream->from_id : stream->to_id);
      char port_key[80];
      if (component == NULL || component->values.n == 0)
        continue;
      g_snprintf (port_key, sizeof port_key, "%s.%s", n == 1 ? stream->from_port : stream->to_port, key);
      value = hl_values_find (&component->values, port_key);
      if (value != NULL && where != NULL)
        *where = hl_stream_alias (stream, key, n);
    }
  return value;
}

const HlValue *
hl_plant_value_wherever (const HlPlant *plant, const HlAddress *address, HlAddress *where)
{
  const HlValue *value = hl_plant_value (plant, address);
  const char *key;
  const HlStream *stream;
  if (value != NULL)
    {
      if (where != NULL)
        *where = *address;
      return value;
    }
  stream = hl_plant_stream_of_address (plant, address, &key);
  return stream != NULL ? hl_plant_state_value (plant, stream, key, where) : NULL;
}

static guint
count_assumed (const HlValues *values)
{
  guint n = 0;
  for (guint i = 0; i < values->n; i++)
    n += values->entries[i].value.origin == HL_ORIGIN_ASSUMED;
  return n;
}

guint
hl_plant_n_assumed (const HlPlant *plant)
{
  guint n;
  g_return_val_if_fail (plant != NULL, 0);
  n = count_assumed (&plant->values);
  for (guint i = 0; i < plant->components->len; i++)
    n += count_assumed (&((HlComponent *) plant->components->pdata[i])->values);
  for (guint i = 0; i < plant->streams->len; i++)
    n += count_assumed (&((HlStream *) plant->streams->pdata[i])->values);
  return n;
}
