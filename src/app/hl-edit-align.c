/* Lines components up, and spaces them evenly.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "app/hl-edit.h"
#include <math.h>

typedef struct {
  const char *id;
  int place, half;     /* on the axis in question */
} Item;

static GArray *
items_of (const HlPlant *plant, const char *const *ids, guint n, gboolean is_across)
{
  GArray *items = g_array_new (FALSE, FALSE, sizeof (Item));
  for (guint i = 0; i < n; i++)
    {
      const HlComponent *component = hl_plant_find_component (plant, ids[i]);
      int half_width, half_height;
      Item item;
      if (component == NULL)
        continue;
      hl_component_half_size (component, &half_width, &half_height);
      item = (Item) { ids[i], is_across ? component->x : component->y, is_across ? half_width : half_height };
      g_array_append_val (items, item);
    }
  return items;
}

/* Takes @plant. */
static HlPlant *
move_one (HlPlant *plant, const Item *item, int to, gboolean is_across)
{
  int by = to - item->place;
  HlPlant *moved;
  if (by == 0)
    return plant;
  moved = hl_edit_move (plant, &item->id, 1, is_across ? by : 0, is_across ? 0 : by);
  hl_plant_unref (plant);
  return moved;
}

HlPlant *
hl_edit_align (const HlPlant *plant, const char *const *ids, guint n, HlAlignment alignment)
{
  gboolean is_across = alignment <= HL_ALIGN_RIGHT;
  int side = (int) alignment % 3 - 1;     /* -1 the lesser edge, 0 the middle, 1 the greater edge */
  g_autoptr (GArray) items = items_of (plant, ids, n, is_across);
  HlPlant *result = hl_plant_ref ((HlPlant *) plant);
  int low = G_MAXINT, high = G_MININT;
  for (guint i = 0; i < items->len; i++)
    {
      const Item *item = &g_array_index (items, Item, i);
      low = MIN (low, item->place - item->half);
      high = MAX (high, item->place + item->half);
    }
  for (guint i = 0; i < items->len; i++)
    {
      const Item *item = &g_array_index (items, Item, i);
      int to = side < 0 ? low + item->half : side > 0 ? high - item->half : (int) floor ((low + high) / 2.0);
      result = move_one (result, item, to, is_across);
    }
  return result;
}

static int
by_place (gconstpointer a, gconstpointer b)
{
  return ((const Item *) a)->place - ((const Item *) b)->place;
}

HlPlant *
hl_edit_distribute (const HlPlant *plant, const char *const *ids, guint n, gboolean is_across)
{
  g_autoptr (GArray) items = items_of (plant, ids, n, is_across);
  HlPlant *result = hl_plant_ref ((HlPlant *) plant);
  int first, last;
  if (items->len < 3)
    return result;
  g_array_sort (items, by_place);
  first = g_array_index (items, Item, 0).place;
  last = g_array_index (items, Item, items->len - 1).place;
  for (guint i = 1; i + 1 < items->len; i++)
    result = move_one (result, &g_array_index (items, Item, i),
                       first + (int) floor ((last - first) * (double) i / (items->len - 1) + 0.5), is_across);
  return result;
}
