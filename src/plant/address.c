/* Addresses in and out of text.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "plant/component-private.h"
#include "plant/plant.h"
#include "plant/i18n.h"
#include <string.h>

HlAddress
hl_address_component (const char *id, const char *key)
{
  return (HlAddress) { HL_OWNER_COMPONENT, g_intern_string (id), g_intern_string (key) };
}

HlAddress
hl_address_stream (const char *id, const char *key)
{
  return (HlAddress) { HL_OWNER_STREAM, g_intern_string (id), g_intern_string (key) };
}

HlAddress
hl_address_plant (const char *key)
{
  return (HlAddress) { HL_OWNER_PLANT, g_intern_static_string (""), g_intern_string (key) };
}

gboolean
hl_address_equal (const HlAddress *a, const HlAddress *b)
{
  return a->owner == b->owner && a->id == b->id && a->key == b->key;
}

char *
hl_address_to_text (const HlAddress *address)
{
  g_return_val_if_fail (address != NULL, NULL);
  switch (address->owner)
    {
    case HL_OWNER_PLANT:
      return g_strdup_printf ("plant.%s", address->key);
    case HL_OWNER_STREAM:
      if (g_ascii_isdigit (address->id[0]))
        return g_strdup_printf ("%s:%s", address->key, address->id);
      break;
    case HL_OWNER_COMPONENT:
    default:
      break;
    }
  return g_strdup_printf ("%s.%s", address->id, address->key);
}

gboolean
hl_id_is_valid (const char *id, gboolean may_start_with_digit)
{
  glong length;
  if (!g_utf8_validate (id, -1, NULL))
    return FALSE;
  length = g_utf8_strlen (id, -1);
  if (length < 1 || length > HL_MAX_ID || g_str_equal (id, "plant") || g_str_equal (id, "stream"))
    return FALSE;
  if (!g_unichar_isalpha (g_utf8_get_char (id)) && !(may_start_with_digit && g_ascii_isdigit (id[0])))
    return FALSE;
  for (const char *at = id; *at != '\0'; at = g_utf8_next_char (at))
    {
      gunichar c = g_utf8_get_char (at);
      if (c != '_' && !g_unichar_isalpha (c) && !(c < 128 && g_ascii_isdigit ((char) c)))
        return FALSE;
    }
  return TRUE;
}

static gboolean
key_is_valid (const char *key)
{
  if (!g_ascii_isalpha (key[0]) || strlen (key) > 64)
    return FALSE;
  for (const char *at = key; *at != '\0'; at++)
    if (!g_ascii_isalnum (*at) && *at != '_' && *at != '.')
      return FALSE;
  return TRUE;
}

static gboolean
refuse (GError **error, const char *text, const char *format, ...) G_GNUC_PRINTF (3, 4);
static gboolean
refuse (GError **error, const char *text, const char *format, ...)
{
  va_list arguments;
  g_autofree char *why = NULL;
  va_start (arguments, format);
  why = g_strdup_vprintf (format, arguments);
  va_end (arguments);
  g_set_error (error, HL_PLANT_ERROR, HL_PLANT_ERROR_ADDRESS, _("“%s” names no quantity: %s"), text, why);
  return FALSE;
}

/* Splits text into owner, id and key by its form alone. */
static gboolean
split (const char *text, HlOwner *owner, char **id, char **key, GError **error)
{
  const char *colon = strchr (text, ':'), *dot;
  const char *rest = text;
  if (colon != NULL && strncmp (text, "stream:", 7) != 0)
    {
      *owner = HL_OWNER_STREAM;
      *key = g_strndup (text, (gsize) (colon - text));
      *id = g_strdup (colon + 1);
      return TRUE;
    }
  if (colon != NULL)
    rest = colon + 1;
  dot = strchr (rest, '.');
  if (dot == NULL)
    return refuse (error, text, _("write component.quantity, component.port.p, m:1 for a stream, or plant.quantity"));
  *id = g_strndup (rest, (gsize) (dot - rest));
  *key = g_strdup (dot + 1);
  if (colon != NULL)
    *owner = HL_OWNER_STREAM;
  else if (g_str_equal (*id, "plant"))
    *owner = HL_OWNER_PLANT;
  else
    *owner = hl_stream_quantity_lookup (*key) != NULL ? HL_OWNER_STREAM : HL_OWNER_COMPONENT;
  return TRUE;
}

/* Whether the plant has it; says which part of the address is wrong. */
static gboolean
check_exists (const char *text, const HlPlant *plant, HlOwner owner, const char *id, const char *key, GError **error)
{
  const HlComponent *component;
  switch (owner)
    {
    case HL_OWNER_PLANT:
      if (hl_plant_quantity_lookup (key) != NULL)
        return TRUE;
      return refuse (error, text, _("the plant has no quantity “%s”"), key);
    case HL_OWNER_STREAM:
      if (hl_plant_find_stream (plant, id) == NULL)
        return refuse (error, text, _("there is no stream “%s”"), id);
      if (hl_stream_quantity_lookup (key) != NULL)
        return TRUE;
      return refuse (error, text, _("a stream has m, p, T, h, s, x and v, but no “%s”"), key);
    case HL_OWNER_COMPONENT:
    default:
      component = hl_plant_find_component (plant, id);
      if (component == NULL)
        return refuse (error, text, _("there is no component “%s”"), id);
      if (hl_component_quantity_kind (component, key) != NULL)
        return TRUE;
      return refuse (error, text, _("%s (%s) has no quantity “%s”"), id, _(component->kind->name), key);
    }
}

gboolean
hl_address_parse (const char *text, const HlPlant *plant, HlAddress *address, GError **error)
{
  g_autofree char *id = NULL, *key = NULL, *trimmed = NULL;
  HlOwner owner = HL_OWNER_COMPONENT;
  g_return_val_if_fail (text != NULL && address != NULL, FALSE);
  if (!g_utf8_validate (text, -1, NULL) || strlen (text) > 256)
    return refuse (error, "…", _("the text is not UTF-8, or too long"));
  trimmed = g_strstrip (g_strdup (text));
  if (!split (trimmed, &owner, &id, &key, error))
    return FALSE;
  if (owner != HL_OWNER_PLANT && !hl_id_is_valid (id, owner == HL_OWNER_STREAM))
    return refuse (error, trimmed, _("“%s” is no id: an id starts with a letter and has only letters, digits and _"), id);
  if (!key_is_valid (key))
    return refuse (error, trimmed, _("“%s” is no name of a quantity"), key);
  if (owner == HL_OWNER_STREAM && hl_stream_quantity_lookup (key) == NULL)
    return refuse (error, trimmed, _("a stream has m, p, T, h, s, x and v, but no “%s”"), key);
  if (plant != NULL && !check_exists (trimmed, plant, owner, id, key, error))
    return FALSE;
  *address = (HlAddress) { owner, g_intern_string (owner == HL_OWNER_PLANT ? "" : id), g_intern_string (key) };
  return TRUE;
}
