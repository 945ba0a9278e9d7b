/* Components: creation, options, ports and quantities with the counts put in.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "plant/component-private.h"
#include "plant/i18n.h"
#include <math.h>
#include <string.h>

/* Numbered keys are asked for on every solve, so they are interned once for all numbers a pattern can have. */
#define MAX_NUMBER 9   /* extractions + 1 */
typedef struct { const char *keys[MAX_NUMBER + 1]; } NumberedKeys;

static gpointer
build_numbered_keys (G_GNUC_UNUSED gpointer data)
{
  GHashTable *table = g_hash_table_new (NULL, NULL);   /* by address of the pattern in its table */
  for (guint k = 0; k < hl_kind_count (); k++)
    {
      const HlKind *kind = hl_kind_nth (k);
      for (guint i = 0; i < kind->n_ports + kind->n_quantities; i++)
        {
          const char *pattern = i < kind->n_ports ? kind->ports[i].key : kind->quantities[i - kind->n_ports].key;
          const char *mark = strchr (pattern, '#');
          NumberedKeys *keys;
          if (g_hash_table_contains (table, pattern))
            continue;
          keys = g_new0 (NumberedKeys, 1);
          if (mark == NULL)
            keys->keys[0] = g_intern_static_string (pattern);
          for (int n = 1; mark != NULL && n <= MAX_NUMBER; n++)
            {
              g_autofree char *text = g_strdup_printf ("%.*s%d%s", (int) (mark - pattern), pattern, n, mark + 1);
              keys->keys[n] = g_intern_string (text);
            }
          g_hash_table_insert (table, (gpointer) pattern, keys);
        }
    }
  return table;
}

const char *
hl_numbered_key (const char *key, int number)
{
  static GOnce once = G_ONCE_INIT;
  const NumberedKeys *keys = g_hash_table_lookup (g_once (&once, build_numbered_keys, NULL), key);
  g_return_val_if_fail (keys != NULL && number >= 0 && number <= MAX_NUMBER, NULL);
  return keys->keys[number];
}

gboolean
hl_key_matches (const char *pattern, int most, const char *key, int *number)
{
  const char *mark = strchr (pattern, '#');
  gsize before;
  *number = 0;
  if (mark == NULL)
    return strcmp (pattern, key) == 0;
  before = (gsize) (mark - pattern);
  if (strncmp (pattern, key, before) != 0 || !g_ascii_isdigit (key[before]))
    return FALSE;
  *number = key[before] - '0';
  return *number >= 1 && *number <= most && strcmp (mark + 1, key + before + 1) == 0;
}

HlComponent *
hl_component_new_bare (const HlKind *kind, const char *id, int x, int y)
{
  HlComponent *component;
  g_return_val_if_fail (kind != NULL && id != NULL, NULL);
  component = g_new0 (HlComponent, 1);
  g_atomic_ref_count_init (&component->ref_count);
  component->kind = kind;
  component->id = g_intern_string (id);
  component->name = g_strdup ("");
  component->x = x;
  component->y = y;
  component->options = g_new0 (int, MAX (kind->n_options, 1));
  for (guint i = 0; i < kind->n_options; i++)
    component->options[i] = kind->options[i].usual;
  return component;
}

static const HlChoiceDefault *
chosen_default (const HlComponent *component, const HlQuantityKind *quantity)
{
  if (component == NULL || quantity->default_option == NULL)
    return NULL;
  const HlChoiceDefault *chosen = &quantity->choice_defaults[hl_component_option (component, quantity->default_option)];
  return chosen->source != NULL ? chosen : NULL;
}

double
hl_component_default (const HlComponent *component, const HlQuantityKind *quantity, int number)
{
  const HlChoiceDefault *chosen;
  g_return_val_if_fail (quantity != NULL, NAN);
  chosen = chosen_default (component, quantity);
  return chosen != NULL ? chosen->value : hl_quantity_default (quantity, number);
}

const char *
hl_component_default_source (const HlComponent *component, const HlQuantityKind *quantity)
{
  const HlChoiceDefault *chosen;
  g_return_val_if_fail (quantity != NULL, NULL);
  chosen = chosen_default (component, quantity);
  return chosen != NULL ? chosen->source : quantity->default_source;
}

static void
assume_default (HlComponent *component, const HlQuantity *quantity)
{
  HlValue value = { .origin = HL_ORIGIN_ASSUMED, .value = hl_component_default (component, quantity->kind, quantity->number) };
  if ((quantity->kind->flags & HL_QUANTITY_ASSUMED) && !isnan (value.value))
    hl_values_set (&component->values, quantity->key, &value);
}

HlComponent *
hl_component_new (const HlKind *kind, const char *id, int x, int y)
{
  HlComponent *component = hl_component_new_bare (kind, id, x, y);
  guint n = component != NULL ? hl_component_n_quantities (component) : 0;
  for (guint i = 0; i < n; i++)
    {
      HlQuantity quantity = hl_component_quantity (component, i);
      assume_default (component, &quantity);
    }
  return component;
}

HlComponent *
hl_component_copy (const HlComponent *component)
{
  HlComponent *copy;
  g_return_val_if_fail (component != NULL, NULL);
  copy = g_memdup2 (component, sizeof *component);
  g_atomic_ref_count_init (&copy->ref_count);
  copy->name = g_strdup (component->name);
  copy->options = g_memdup2 (component->options, MAX (component->kind->n_options, 1) * sizeof (int));
  hl_values_copy (&copy->values, &component->values);
  if (copy->extra != NULL)
    json_object_ref (copy->extra);   /* never changed once read, so it can be shared */
  return copy;
}

HlComponent *
hl_component_ref (HlComponent *component)
{
  g_return_val_if_fail (component != NULL, NULL);
  g_atomic_ref_count_inc (&component->ref_count);
  return component;
}

void
hl_component_unref (HlComponent *component)
{
  if (component == NULL || !g_atomic_ref_count_dec (&component->ref_count))
    return;
  g_free (component->name);
  g_free (component->options);
  hl_values_clear (&component->values);
  g_clear_pointer (&component->extra, json_object_unref);
  g_free (component);
}

void
hl_component_set_name (HlComponent *component, const char *name)
{
  g_return_if_fail (component != NULL);
  g_free (component->name);
  component->name = g_strdup (name != NULL ? name : "");
}

/* Keys of own quantities that exist now, to see which appear. */
static GHashTable *
existing_keys (const HlComponent *component)
{
  GHashTable *keys = g_hash_table_new (NULL, NULL);
  guint n = hl_component_n_quantities (component);
  for (guint i = 0; i < n; i++)
    g_hash_table_add (keys, (gpointer) hl_component_quantity (component, i).key);
  return keys;
}

void
hl_component_set_option (HlComponent *component, const char *key, int value)
{
  g_autoptr (GHashTable) before = NULL;
  gboolean had_values;
  int index, old_value;
  g_return_if_fail (component != NULL && key != NULL);
  index = hl_kind_find_option (component->kind, key);
  g_return_if_fail (index >= 0);
  had_values = component->values.n > 0;
  before = existing_keys (component);
  old_value = component->options[index];
  component->options[index] = CLAMP (value, component->kind->options[index].least, component->kind->options[index].most);
  for (guint i = component->values.n; i-- > 0;)
    if (hl_component_quantity_kind (component, component->values.entries[i].key) == NULL)
      hl_values_set (&component->values, component->values.entries[i].key, NULL);
  for (guint i = 0; had_values && i < hl_component_n_quantities (component); i++)
    {
      HlQuantity quantity = hl_component_quantity (component, i);
      if (quantity.kind->found_option != NULL && g_str_equal (quantity.kind->found_option, key))
        {
          gboolean is_found = value == quantity.kind->found_choice;
          if (is_found)
            hl_values_set (&component->values, quantity.key, NULL);
          else if (old_value == quantity.kind->found_choice && hl_values_find (&component->values, quantity.key) == NULL)
            assume_default (component, &quantity);
        }
      const HlValue *now = hl_values_find (&component->values, quantity.key);
      gboolean follows = quantity.kind->default_option != NULL && g_str_equal (quantity.kind->default_option, key)
                         && now != NULL && now->origin == HL_ORIGIN_ASSUMED;
      if (!g_hash_table_contains (before, quantity.key) || follows)
        assume_default (component, &quantity);
    }
}

void
hl_component_set_value (HlComponent *component, const char *key, const HlValue *value)
{
  g_return_if_fail (component != NULL && key != NULL);
  g_return_if_fail (hl_component_quantity_kind (component, key) != NULL);
  hl_values_set (&component->values, key, value);
}

int
hl_component_option (const HlComponent *component, const char *key)
{
  int index;
  g_return_val_if_fail (component != NULL && key != NULL, 0);
  index = hl_kind_find_option (component->kind, key);
  return index >= 0 ? component->options[index] : 0;
}

/* How many of a port or quantity there are: 0 when its choice is not taken. */
static int
occurrences (const HlComponent *component, const char *repeat, int extra, const char *when_option, int when_choice)
{
  if (when_option != NULL)
    {
      int choice = hl_component_option (component, when_option);
      if (when_choice >= 0 ? choice != when_choice : choice == HL_UNLESS (when_choice))
        return 0;
    }
  return repeat != NULL ? hl_component_option (component, repeat) + extra : 1;
}

static int
port_occurrences (const HlComponent *component, const HlPortKind *port)
{
  return occurrences (component, port->repeat, 0, port->when_option, port->when_choice);
}

static int
quantity_occurrences (const HlComponent *component, const HlQuantityKind *quantity)
{
  return occurrences (component, quantity->repeat, quantity->repeat_extra, quantity->when_option, quantity->when_choice);
}

guint
hl_component_n_ports (const HlComponent *component)
{
  int n = 0;
  g_return_val_if_fail (component != NULL, 0);
  for (guint i = 0; i < component->kind->n_ports; i++)
    n += port_occurrences (component, &component->kind->ports[i]);
  return (guint) n;
}

HlPort
hl_component_port (const HlComponent *component, guint n)
{
  int left = (int) n;
  g_return_val_if_fail (component != NULL, ((HlPort) { NULL }));
  for (guint i = 0; i < component->kind->n_ports; i++)
    {
      const HlPortKind *port = &component->kind->ports[i];
      int count = port_occurrences (component, port);
      if (left < count)
        {
          int number = port->repeat != NULL ? left + 1 : 0;
          return (HlPort) { port, hl_numbered_key (port->key, number), number };
        }
      left -= count;
    }
  g_return_val_if_reached (((HlPort) { NULL }));
}

gboolean
hl_component_find_port (const HlComponent *component, const char *key, guint *n)
{
  int before = 0;
  g_return_val_if_fail (component != NULL && key != NULL, FALSE);
  for (guint i = 0; i < component->kind->n_ports; i++)
    {
      const HlPortKind *port = &component->kind->ports[i];
      int count = port_occurrences (component, port), number;
      if (count > 0 && hl_key_matches (port->key, count, key, &number))
        {
          if (n != NULL)
            *n = (guint) (before + MAX (number - 1, 0));
          return TRUE;
        }
      before += count;
    }
  return FALSE;
}

static char *
name_with_number (const char *name, int number)
{
  return number > 0 ? g_strdup_printf ("%s %d", _(name), number) : g_strdup (_(name));
}

char *
hl_component_port_name (const HlComponent *component, guint n)
{
  HlPort port = hl_component_port (component, n);
  g_return_val_if_fail (port.kind != NULL, NULL);
  return name_with_number (port.kind->name, port.number);
}

guint
hl_component_n_quantities (const HlComponent *component)
{
  guint n_common;
  int n = 0;
  g_return_val_if_fail (component != NULL, 0);
  for (guint i = 0; i < component->kind->n_quantities; i++)
    n += quantity_occurrences (component, &component->kind->quantities[i]);
  hl_common_quantities (&n_common);
  return (guint) n + n_common;
}

HlQuantity
hl_component_quantity (const HlComponent *component, guint n)
{
  int left = (int) n;
  guint n_common;
  const HlQuantityKind *common = hl_common_quantities (&n_common);
  g_return_val_if_fail (component != NULL, ((HlQuantity) { NULL }));
  for (guint i = 0; i < component->kind->n_quantities; i++)
    {
      const HlQuantityKind *quantity = &component->kind->quantities[i];
      int count = quantity_occurrences (component, quantity);
      if (left < count)
        {
          int number = quantity->repeat != NULL ? left + 1 : 0;
          return (HlQuantity) { quantity, hl_numbered_key (quantity->key, number), number };
        }
      left -= count;
    }
  if (left < (int) n_common)
    return (HlQuantity) { &common[left], g_intern_static_string (common[left].key), 0 };
  g_return_val_if_reached (((HlQuantity) { NULL }));
}

char *
hl_component_quantity_name (const HlComponent *component, guint n)
{
  HlQuantity quantity = hl_component_quantity (component, n);
  g_return_val_if_fail (quantity.kind != NULL, NULL);
  return name_with_number (quantity.kind->name, quantity.number);
}

const HlQuantityKind *
hl_component_quantity_kind (const HlComponent *component, const char *key)
{
  const char *dot;
  guint n_common;
  const HlQuantityKind *common = hl_common_quantities (&n_common);
  g_return_val_if_fail (component != NULL && key != NULL, NULL);
  for (guint i = 0; i < component->kind->n_quantities; i++)
    {
      const HlQuantityKind *quantity = &component->kind->quantities[i];
      int number;
      if (hl_key_matches (quantity->key, quantity_occurrences (component, quantity), key, &number)
          && quantity_occurrences (component, quantity) > 0)
        return quantity;
    }
  for (guint i = 0; i < n_common; i++)
    if (strcmp (common[i].key, key) == 0)
      return &common[i];
  dot = strrchr (key, '.');
  if (dot != NULL && dot - key < 64)
    {
      char port[64];
      memcpy (port, key, (gsize) (dot - key));
      port[dot - key] = '\0';
      if (hl_component_find_port (component, port, NULL))
        return hl_stream_quantity_lookup (dot + 1);
    }
  return NULL;
}
