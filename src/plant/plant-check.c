/* Checks of values, ties and connections, with messages that say how to mend.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "plant/plant-private.h"
#include "plant/i18n.h"
#include <math.h>

/* The hard limits in words: "lies above 0 and at most 1". */
static char *
limits_in_words (const HlQuantityKind *kind, HlUnitSet set)
{
  g_autofree char *low = NULL, *high = hl_quantity_format_exact (kind, kind->at_most, set);
  if (kind->above > 0.0 || kind->above < HL_FROM_ZERO)
    {
      low = hl_quantity_format_exact (kind, kind->above, set);
      return g_strdup_printf (_("must lie above %s and be at most %s"), low, high);
    }
  if (kind->dimension == HL_DIMENSION_TEMPERATURE)
    return g_strdup_printf (_("must lie above absolute zero and be at most %s"), high);
  return g_strdup_printf (kind->above < 0.0 ? _("must be 0 or more and at most %s") : _("must lie above 0 and be at most %s"), high);
}

gboolean
hl_quantity_may_be_put_in (const HlQuantityKind *kind, const char *where, GError **error)
{
  if (!(kind->flags & HL_QUANTITY_DERIVED))
    return TRUE;
  g_set_error (error, HL_PLANT_ERROR, HL_PLANT_ERROR_CONTENT,
               _("%s is read from the finished solution and cannot be put in; give a quantity that it follows from"), where);
  return FALSE;
}

gboolean
hl_quantity_check (const HlQuantityKind *kind, const char *where, double value, HlUnitSet set, GError **error)
{
  g_autofree char *shown = NULL, *limits = NULL;
  if (!hl_quantity_may_be_put_in (kind, where, error))
    return FALSE;
  if (value > kind->above && value <= kind->at_most)
    return TRUE;
  if (!isfinite (value))
    {
      g_set_error (error, HL_PLANT_ERROR, HL_PLANT_ERROR_OUT_OF_RANGE, _("%s is not a finite number"), where);
      return FALSE;
    }
  shown = hl_quantity_format_exact (kind, value, set);
  limits = limits_in_words (kind, set);
  /* Translators: address, value, name of the quantity, limits: "T1.efficiency is 1.4: isentropic efficiency must lie above 0 and be at most 1". */
  g_set_error (error, HL_PLANT_ERROR, HL_PLANT_ERROR_OUT_OF_RANGE, _("%s is %s: the quantity “%s” %s"), where, shown, _(kind->name), limits);
  return FALSE;
}

gboolean
hl_plant_check_tie (const HlPlant *plant, const HlAddress *address, const HlTie *tie, GError **error)
{
  const HlQuantityKind *kind = hl_plant_quantity_kind (plant, address);
  g_autofree char *to = hl_address_to_text (address);
  if (!hl_quantity_may_be_put_in (kind, to, error))
    return FALSE;
  for (guint k = 0; k < hl_tie_n_of (tie); k++)
    {
      const HlQuantityKind *source = hl_plant_quantity_kind (plant, hl_tie_of (tie, k));
      g_autofree char *of = hl_address_to_text (hl_tie_of (tie, k));
      if (hl_addresses_same (plant, address, hl_tie_of (tie, k)))
        g_set_error (error, HL_PLANT_ERROR, HL_PLANT_ERROR_ADDRESS, _("%s cannot be tied to %s: that is the same quantity; tie it to another one"), to, of);
      else if (source != NULL && (source->flags & HL_QUANTITY_DERIVED))
        g_set_error (error, HL_PLANT_ERROR, HL_PLANT_ERROR_CONTENT, _("%s cannot be tied to %s, which is read from the finished solution; tie it to a quantity of the equations"), to, of);
      else
        continue;
      return FALSE;
    }
  return TRUE;
}

static gboolean
refuse (GError **error, const char *message)
{
  g_set_error_literal (error, HL_PLANT_ERROR, HL_PLANT_ERROR_CONTENT, message);
  return FALSE;
}

/* The port, or an error that names what is there instead. */
static gboolean
find_end (const HlPlant *plant, const char *id, const char *port, HlPortDirection wanted, HlPort *found, GError **error)
{
  const HlComponent *component = hl_plant_find_component (plant, id);
  const HlStream *there;
  g_autofree char *message = NULL;
  guint n;
  if (component == NULL)
    message = g_strdup_printf (_("There is no component “%s”"), id);
  else if (!hl_component_find_port (component, port, &n))
    {
      g_autoptr (GString) ports = g_string_new (NULL);
      for (guint i = 0; i < hl_component_n_ports (component); i++)
        g_string_append_printf (ports, "%s%s", i > 0 ? ", " : "", hl_component_port (component, i).key);
      message = ports->len > 0 ? g_strdup_printf (_("%s (%s) has no port “%s”; it has %s"), id, _(component->kind->name), port, ports->str)
                               : g_strdup_printf (_("%s (%s) has no port “%s”; it has none"), id, _(component->kind->name), port);
    }
  else
    {
      *found = hl_component_port (component, n);
      if (found->kind->direction != wanted)
        message = g_strdup_printf (wanted == HL_PORT_OUT ? _("%s.%s is an inlet; a line starts at an outlet")
                                                         : _("%s.%s is an outlet; a line ends at an inlet"), id, port);
      else if ((there = hl_plant_stream_at (plant, id, port)) != NULL)
        message = g_strdup_printf (_("%s.%s already has line %s; put a splitter or a mixer into that line"), id, port, there->id);
    }
  return message == NULL || refuse (error, message);
}

gboolean
hl_plant_can_connect (const HlPlant *plant, const char *from_id, const char *from_port,
                      const char *to_id, const char *to_port, GError **error)
{
  HlPort from, to;
  g_return_val_if_fail (plant != NULL && from_id != NULL && from_port != NULL && to_id != NULL && to_port != NULL, FALSE);
  if (!find_end (plant, from_id, from_port, HL_PORT_OUT, &from, error)
      || !find_end (plant, to_id, to_port, HL_PORT_IN, &to, error))
    return FALSE;
  if (g_str_equal (from_id, to_id) && from.kind->side_circuit == to.kind->side_circuit
      && (from.kind->side_circuit == 0 || from.number == to.number))
    {
      g_autofree char *message = g_strdup_printf (_("%s cannot feed itself: %s and %s belong to the same side of it"), from_id, from_port, to_port);
      return refuse (error, message);
    }
  return TRUE;
}
