/* Names of quantities in sentences.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "plant/plant-private.h"
#include "plant/i18n.h"
#include <string.h>

/* Names are written with a capital for labels.  Inside a sentence most languages want a small letter, German does not. */
static char *
in_sentence (const char *name)
{
  gunichar first = g_utf8_get_char (name);
  const char *rest = g_utf8_next_char (name);
  char small[8] = { 0 };
  /* Translators: "small" where a quantity's name starts with a small letter inside a sentence, otherwise "as is". */
  if (!g_str_equal (C_("first letter of names", "small"), "small") || g_unichar_isupper (g_utf8_get_char (rest)))
    return g_strdup (name);
  g_unichar_to_utf8 (g_unichar_tolower (first), small);
  return g_strconcat (small, rest, NULL);
}

static char *
describe_own (const HlComponent *component, const char *key)
{
  g_autofree char *name = NULL, *small = NULL;
  for (guint i = 0; i < hl_component_n_quantities (component); i++)
    if (g_str_equal (hl_component_quantity (component, i).key, key))
      {
        name = hl_component_quantity_name (component, i);
        small = in_sentence (name);
        /* Translators: a quantity and a component, "isentropic efficiency of T1". */
        return g_strdup_printf (_("%s of %s"), small, component->id);
      }
  return NULL;
}

static char *
describe_port_state (const HlComponent *component, const char *key)
{
  const char *dot = strrchr (key, '.');
  const HlQuantityKind *kind = dot != NULL ? hl_stream_quantity_lookup (dot + 1) : NULL;
  g_autofree char *port = dot != NULL ? g_strndup (key, (gsize) (dot - key)) : g_strdup (key);
  g_autofree char *port_name = NULL, *small = NULL;
  guint n;
  if (!hl_component_find_port (component, port, &n))
    return NULL;
  port_name = hl_component_port_name (component, n);
  if (dot == NULL)
    /* Translators: a port and a component, "steam inlet of T1". */
    return g_strdup_printf (C_("port", "%s of %s"), port_name, component->id);
  if (kind == NULL)
    return NULL;
  small = in_sentence (_(kind->name));
  /* Translators: quantity, port, component: "pressure at steam inlet of T1". */
  return g_strdup_printf (_("%s at %s of %s"), small, port_name, component->id);
}

static char *
describe_component (const HlPlant *plant, const HlAddress *address)
{
  const HlComponent *component = hl_plant_find_component (plant, address->id);
  char *text;
  if (component == NULL)
    return NULL;
  if (address->key[0] == '\0')
    return g_strdup (component->id);
  text = describe_own (component, address->key);
  return text != NULL ? text : describe_port_state (component, address->key);
}

char *
hl_plant_describe (const HlPlant *plant, const HlAddress *address)
{
  const HlQuantityKind *kind;
  g_autofree char *small = NULL;
  char *text = NULL;
  g_return_val_if_fail (plant != NULL && address != NULL, NULL);
  if (address->owner == HL_OWNER_COMPONENT)
    text = describe_component (plant, address);
  else if (address->key[0] == '\0')
    text = address->owner == HL_OWNER_PLANT ? g_strdup (_("the plant")) : g_strdup_printf (_("stream %s"), address->id);
  else if ((kind = hl_plant_quantity_kind (plant, address)) != NULL)
    {
      small = in_sentence (_(kind->name));
      text = address->owner == HL_OWNER_PLANT ? g_strdup_printf (_("%s of the plant"), small)
                                              : g_strdup_printf (_("%s of stream %s"), small, address->id);
    }
  return text != NULL ? text : hl_address_to_text (address);
}
