/* Streams and shafts: creation, copying, values.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "plant/component-private.h"

HlStream *
hl_stream_new (const char *id, const char *from_id, const char *from_port, const char *to_id, const char *to_port)
{
  HlStream *stream;
  g_return_val_if_fail (id != NULL && from_id != NULL && from_port != NULL && to_id != NULL && to_port != NULL, NULL);
  stream = g_new0 (HlStream, 1);
  g_atomic_ref_count_init (&stream->ref_count);
  stream->id = g_intern_string (id);
  stream->from_id = g_intern_string (from_id);
  stream->from_port = g_intern_string (from_port);
  stream->to_id = g_intern_string (to_id);
  stream->to_port = g_intern_string (to_port);
  stream->medium = g_intern_static_string ("water");
  return stream;
}

HlStream *
hl_stream_copy (const HlStream *stream)
{
  HlStream *copy;
  g_return_val_if_fail (stream != NULL, NULL);
  copy = g_memdup2 (stream, sizeof *stream);
  g_atomic_ref_count_init (&copy->ref_count);
  copy->route = stream->n_route > 0 ? g_memdup2 (stream->route, stream->n_route * sizeof (HlGridPoint)) : NULL;
  hl_values_copy (&copy->values, &stream->values);
  if (copy->extra != NULL)
    json_object_ref (copy->extra);
  return copy;
}

HlStream *
hl_stream_ref (HlStream *stream)
{
  g_return_val_if_fail (stream != NULL, NULL);
  g_atomic_ref_count_inc (&stream->ref_count);
  return stream;
}

void
hl_stream_unref (HlStream *stream)
{
  if (stream == NULL || !g_atomic_ref_count_dec (&stream->ref_count))
    return;
  g_free (stream->route);
  hl_values_clear (&stream->values);
  g_clear_pointer (&stream->extra, json_object_unref);
  g_free (stream);
}

void
hl_stream_set_value (HlStream *stream, const char *key, const HlValue *value)
{
  g_return_if_fail (stream != NULL && key != NULL);
  g_return_if_fail (hl_stream_quantity_lookup (key) != NULL);
  hl_values_set (&stream->values, key, value);
}

HlShaft *
hl_shaft_new (const char *id, const char *const *joins, guint n_joins)
{
  HlShaft *shaft;
  g_return_val_if_fail (id != NULL && (joins != NULL || n_joins == 0), NULL);
  shaft = g_new0 (HlShaft, 1);
  g_atomic_ref_count_init (&shaft->ref_count);
  shaft->id = g_intern_string (id);
  shaft->n_joins = n_joins;
  shaft->joins = g_new0 (const char *, n_joins + 1);
  for (guint i = 0; i < n_joins; i++)
    shaft->joins[i] = g_intern_string (joins[i]);
  return shaft;
}

HlShaft *
hl_shaft_copy_without (const HlShaft *shaft, const char *id)
{
  HlShaft *copy = hl_shaft_new (shaft->id, NULL, 0);
  g_free (copy->joins);
  copy->joins = g_new0 (const char *, shaft->n_joins + 1);
  for (guint i = 0; i < shaft->n_joins; i++)
    if (shaft->joins[i] != id)
      copy->joins[copy->n_joins++] = shaft->joins[i];
  if (shaft->extra != NULL)
    copy->extra = json_object_ref (shaft->extra);
  return copy;
}

HlShaft *
hl_shaft_ref (HlShaft *shaft)
{
  g_return_val_if_fail (shaft != NULL, NULL);
  g_atomic_ref_count_inc (&shaft->ref_count);
  return shaft;
}

void
hl_shaft_unref (HlShaft *shaft)
{
  if (shaft == NULL || !g_atomic_ref_count_dec (&shaft->ref_count))
    return;
  g_free (shaft->joins);
  g_clear_pointer (&shaft->extra, json_object_unref);
  g_free (shaft);
}
