/* Whether two plants have the same content.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "plant/plant-private.h"
#include <string.h>

static gboolean
components_equal (const HlComponent *a, const HlComponent *b)
{
  return a == b
         || (a->kind == b->kind && a->id == b->id && g_str_equal (a->name, b->name) && a->x == b->x && a->y == b->y
             && a->turn == b->turn && !a->is_mirrored == !b->is_mirrored
             && memcmp (a->options, b->options, a->kind->n_options * sizeof (int)) == 0
             && hl_values_equal (&a->values, &b->values) && hl_json_object_equal (a->extra, b->extra));
}

static gboolean
streams_equal (const HlStream *a, const HlStream *b)
{
  return a == b
         || (a->id == b->id && a->from_id == b->from_id && a->from_port == b->from_port && a->to_id == b->to_id
             && a->to_port == b->to_port && a->medium == b->medium && a->n_route == b->n_route
             && (a->n_route == 0 || memcmp (a->route, b->route, a->n_route * sizeof (HlGridPoint)) == 0)
             && !a->has_label_place == !b->has_label_place
             && (!a->has_label_place || (a->label_x == b->label_x && a->label_y == b->label_y))
             && hl_values_equal (&a->values, &b->values) && hl_json_object_equal (a->extra, b->extra));
}

static gboolean
shafts_equal (const HlShaft *a, const HlShaft *b)
{
  return a == b
         || (a->id == b->id && a->n_joins == b->n_joins && memcmp (a->joins, b->joins, a->n_joins * sizeof (char *)) == 0
             && hl_json_object_equal (a->extra, b->extra));
}

static gboolean
lists_equal (const GPtrArray *a, const GPtrArray *b, GEqualFunc items_equal)
{
  if (a == b)
    return TRUE;
  if (a->len != b->len)
    return FALSE;
  for (guint i = 0; i < a->len; i++)
    if (!items_equal (a->pdata[i], b->pdata[i]))
      return FALSE;
  return TRUE;
}

gboolean
hl_plant_equal (const HlPlant *a, const HlPlant *b)
{
  g_return_val_if_fail (a != NULL && b != NULL, FALSE);
  return a == b
         || (g_str_equal (a->title, b->title) && a->formulation == b->formulation && a->units == b->units
             && memcmp (&a->site, &b->site, sizeof a->site) == 0
             && lists_equal (a->components, b->components, (GEqualFunc) components_equal)
             && lists_equal (a->streams, b->streams, (GEqualFunc) streams_equal)
             && lists_equal (a->shafts, b->shafts, (GEqualFunc) shafts_equal)
             && hl_values_equal (&a->values, &b->values) && hl_dismissals_equal (a, b) && hl_json_object_equal (a->extra, b->extra)
             && hl_json_object_equal (a->site_extra, b->site_extra) && hl_json_object_equal (a->plant_extra, b->plant_extra));
}
