/* Sorted lists of values by key.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "plant/component-private.h"
#include "plant/i18n.h"
#include <string.h>

const char *
hl_origin_id (HlOrigin origin)
{
  static const char *const ids[] = { "found", "given", "assumed", "tied" };
  g_return_val_if_fail ((guint) origin < G_N_ELEMENTS (ids), NULL);
  return ids[origin];
}

const char *
hl_origin_name (HlOrigin origin)
{
  static const char *const names[] = { N_("found"), N_("given"), N_("assumed"), N_("tied") };
  g_return_val_if_fail ((guint) origin < G_N_ELEMENTS (names), NULL);
  return _(names[origin]);
}

/* Position of the first entry whose key is not before @key. */
static guint
lower_bound (const HlValues *values, const char *key)
{
  guint low = 0, high = values->n;
  while (low < high)
    {
      guint middle = (low + high) / 2;
      if (strcmp (values->entries[middle].key, key) < 0)
        low = middle + 1;
      else
        high = middle;
    }
  return low;
}

const HlValue *
hl_values_find (const HlValues *values, const char *key)
{
  guint at;
  g_return_val_if_fail (values != NULL && key != NULL, NULL);
  at = lower_bound (values, key);
  if (at < values->n && strcmp (values->entries[at].key, key) == 0)
    return &values->entries[at].value;
  return NULL;
}

void
hl_values_set (HlValues *values, const char *key, const HlValue *value)
{
  guint at = lower_bound (values, key);
  gboolean present = at < values->n && strcmp (values->entries[at].key, key) == 0;
  if (value == NULL)
    {
      if (!present)
        return;
      memmove (values->entries + at, values->entries + at + 1, (values->n - at - 1) * sizeof (HlValueEntry));
      values->n--;
      return;
    }
  if (!present)
    {
      HlValue kept = *value;   /* may point into the array that moves */
      values->entries = g_renew (HlValueEntry, values->entries, values->n + 1);
      memmove (values->entries + at + 1, values->entries + at, (values->n - at) * sizeof (HlValueEntry));
      values->n++;
      values->entries[at] = (HlValueEntry) { g_intern_string (key), kept };
      return;
    }
  values->entries[at].value = *value;
}

void
hl_values_copy (HlValues *to, const HlValues *from)
{
  to->n = from->n;
  to->entries = from->n > 0 ? g_memdup2 (from->entries, from->n * sizeof (HlValueEntry)) : NULL;
}

void
hl_values_clear (HlValues *values)
{
  g_clear_pointer (&values->entries, g_free);
  values->n = 0;
}

gboolean
hl_value_equal (const HlValue *a, const HlValue *b)
{
  if (a->origin != b->origin)
    return FALSE;
  if (a->origin == HL_ORIGIN_TIED)
    return a->tie == b->tie;
  return memcmp (&a->value, &b->value, sizeof (double)) == 0;
}

gboolean
hl_values_equal (const HlValues *a, const HlValues *b)
{
  if (a->n != b->n)
    return FALSE;
  for (guint i = 0; i < a->n; i++)
    if (a->entries[i].key != b->entries[i].key || !hl_value_equal (&a->entries[i].value, &b->entries[i].value))
      return FALSE;
  return TRUE;
}
