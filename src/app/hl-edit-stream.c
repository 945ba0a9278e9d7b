/* What the canvas can do to a line: bends set by hand, an end moved to another port.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "app/hl-edit.h"
#include "plant/i18n.h"

HlPlant *
hl_edit_route (const HlPlant *plant, const char *stream, const HlGridPoint *bends, guint n)
{
  HlStream *copy = hl_stream_copy (hl_plant_find_stream (plant, stream));
  g_free (copy->route);
  copy->route = g_memdup2 (bends, n * sizeof *bends);
  copy->n_route = n;
  return hl_plant_with_stream (plant, copy);
}

HlPlant *
hl_edit_replug (const HlPlant *plant, const char *stream_id, const char *id, const char *port, GError **error)
{
  const HlStream *stream = hl_plant_find_stream (plant, stream_id);
  const HlComponent *component = hl_plant_find_component (plant, id);
  const char *const ids[] = { stream_id, NULL };
  g_autoptr (HlPlant) without = NULL;
  gboolean is_outlet;
  HlStream *copy;
  guint n;

  if (stream == NULL || component == NULL || !hl_component_find_port (component, port, &n))
    {
      g_set_error (error, HL_PLANT_ERROR, HL_PLANT_ERROR_ADDRESS, _("There is no such line or port"));
      return NULL;
    }
  is_outlet = hl_component_port (component, n).kind->direction == HL_PORT_OUT;
  without = hl_plant_without (plant, ids);
  if (!hl_edit_can_connect (without, is_outlet ? stream->to_id : stream->from_id, is_outlet ? stream->to_port : stream->from_port, id, port, error))
    return NULL;
  copy = hl_stream_copy (stream);
  if (is_outlet)
    {
      copy->from_id = component->id;
      copy->from_port = hl_component_port (component, n).key;
    }
  else
    {
      copy->to_id = component->id;
      copy->to_port = hl_component_port (component, n).key;
    }
  /* Bends and label belonged to the former way. */
  g_clear_pointer (&copy->route, g_free);
  copy->n_route = 0;
  copy->has_label_place = FALSE;
  return hl_plant_with_stream (plant, copy);
}
