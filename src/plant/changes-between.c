/* The changes that lead from one plant to another, in an order in which they apply.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "plant/change-private.h"
#include <string.h>

/* Each change is applied as soon as it is found, so that the next one sees what it took along: a component that goes takes
 * its streams, an option brings and drops values. */
typedef struct {
  GPtrArray     *changes;
  HlPlant       *now;
  const HlPlant *goal;
} Walk;

static void
take (Walk *walk, HlChange *change)
{
  HlPlant *next = hl_change_apply (change, walk->now, NULL);
  if (next == NULL)     /* both plants are whole, so what one has the other can be given; never seen, but nothing must be lost */
    g_debug ("change of %s does not apply", hl_change_where (change));
  else
    {
      hl_plant_unref (walk->now);
      walk->now = next;
    }
  g_ptr_array_add (walk->changes, change);
}

static JsonNode *
number_node (double number)
{
  return json_node_init_double (json_node_alloc (), number);
}

static JsonNode *
int_node (int number)
{
  return json_node_init_int (json_node_alloc (), number);
}

static JsonNode *
text_node (const char *text)
{
  return json_node_init_string (json_node_alloc (), text);
}

static void
add_point (JsonArray *array, int x, int y)
{
  json_array_add_int_element (array, x);
  json_array_add_int_element (array, y);
}

static JsonNode *
array_node (JsonArray *array)
{
  JsonNode *node = json_node_alloc ();
  json_node_init_array (node, array);
  json_array_unref (array);
  return node;
}

static JsonNode *
point_node (int x, int y)
{
  JsonArray *array = json_array_new ();
  add_point (array, x, y);
  return array_node (array);
}

static JsonNode *
route_node (const HlStream *stream)
{
  JsonArray *array = json_array_new ();
  for (guint i = 0; i < stream->n_route; i++)
    {
      JsonArray *point = json_array_new ();
      add_point (point, stream->route[i].x, stream->route[i].y);
      json_array_add_array_element (array, point);
    }
  return array_node (array);
}

static void
set_of (Walk *walk, const char *id, gboolean is_stream, const char *key, JsonNode *to)
{
  g_autofree char *where = g_strconcat (is_stream ? "stream:" : "", id, ".", key, NULL);
  take (walk, hl_change_new_set (where, to, NULL));
}

/* Site */

static void
site_number (Walk *walk, const char *key, double now, double goal)
{
  if (memcmp (&now, &goal, sizeof now) != 0)
    set_of (walk, "plant", FALSE, key, number_node (goal));
}

static void
walk_site (Walk *walk)
{
  HlSite now = *hl_plant_site (walk->now), goal = *hl_plant_site (walk->goal);
  site_number (walk, "site.altitude", now.altitude, goal.altitude);
  site_number (walk, "site.ambient_T", now.ambient_T, goal.ambient_T);
  site_number (walk, "site.wet_bulb_T", now.wet_bulb_T, goal.wet_bulb_T);
  site_number (walk, "site.dead_T", now.dead_T, goal.dead_T);
  site_number (walk, "site.dead_p", now.dead_p, goal.dead_p);
}

/* What goes */

static const HlShaft *
find_shaft (const HlPlant *plant, const char *id)
{
  for (guint i = 0; i < hl_plant_n_shafts (plant); i++)
    if (hl_plant_shaft (plant, i)->id == id)
      return hl_plant_shaft (plant, i);
  return NULL;
}

static gboolean
same_joins (const HlShaft *a, const HlShaft *b)
{
  return a != NULL && b != NULL && a->n_joins == b->n_joins && memcmp (a->joins, b->joins, a->n_joins * sizeof a->joins[0]) == 0;
}

static gboolean
same_ends (const HlStream *a, const HlStream *b)
{
  return a != NULL && b != NULL && a->from_id == b->from_id && a->from_port == b->from_port && a->to_id == b->to_id && a->to_port == b->to_port;
}

/* Backwards, so that what is still to be looked at keeps its place. */
static void
walk_removals (Walk *walk)
{
  for (guint i = hl_plant_n_shafts (walk->now); i-- > 0;)
    {
      const HlShaft *shaft = hl_plant_shaft (walk->now, i);
      if (!same_joins (shaft, find_shaft (walk->goal, shaft->id)))
        take (walk, hl_change_new_remove (shaft->id));
    }
  for (guint i = hl_plant_n_streams (walk->now); i-- > 0;)
    {
      const HlStream *stream = hl_plant_stream (walk->now, i);
      if (!same_ends (stream, hl_plant_find_stream (walk->goal, stream->id)))
        take (walk, hl_change_new_remove (stream->id));
    }
  for (guint i = hl_plant_n_components (walk->now); i-- > 0;)
    {
      const HlComponent *component = hl_plant_component (walk->now, i);
      const HlComponent *goal = hl_plant_find_component (walk->goal, component->id);
      if (goal == NULL || goal->kind != component->kind)
        take (walk, hl_change_new_remove (component->id));
    }
}

/* What comes, without ties: the quantities that they name may come later */

static void
drop_ties (HlValues *values)
{
  for (guint i = values->n; i-- > 0;)
    if (values->entries[i].value.origin == HL_ORIGIN_TIED)
      hl_values_set (values, values->entries[i].key, NULL);
}

static HlChange *
addition (GString *text)
{
  JsonNode *node = hl_json_parse (text->str, text->len, "addition", NULL, NULL);
  HlChange *change = hl_change_new_add (json_object_ref (json_node_get_object (node)));
  json_node_unref (node);
  g_string_free (text, TRUE);
  return change;
}

static void
add_component (Walk *walk, const HlComponent *component)
{
  g_autoptr (HlComponent) copy = hl_component_copy (component);
  GString *text = g_string_new (NULL);
  drop_ties (&copy->values);
  hl_json_append_component (text, copy);
  take (walk, addition (text));
}

static void
add_stream (Walk *walk, const HlStream *stream)
{
  g_autoptr (HlStream) copy = hl_stream_copy (stream);
  GString *text = g_string_new (NULL);
  drop_ties (&copy->values);
  hl_json_append_stream (text, copy);
  take (walk, addition (text));
}

static void
walk_component (Walk *walk, const HlComponent *goal)
{
  const HlComponent *now = hl_plant_find_component (walk->now, goal->id);
  if (now == NULL)
    {
      add_component (walk, goal);
      return;
    }
  for (guint i = 0; i < goal->kind->n_options; i++)
    {
      const HlOptionKind *option = &goal->kind->options[i];
      now = hl_plant_find_component (walk->now, goal->id);
      if (now->options[i] != goal->options[i])
        set_of (walk, goal->id, FALSE, option->key,
                option->choices != NULL ? text_node (option->choices[goal->options[i]]) : int_node (goal->options[i]));
    }
  now = hl_plant_find_component (walk->now, goal->id);
  if (!g_str_equal (now->name, goal->name))
    set_of (walk, goal->id, FALSE, "name", text_node (goal->name));
  now = hl_plant_find_component (walk->now, goal->id);
  if (now->x != goal->x || now->y != goal->y)
    set_of (walk, goal->id, FALSE, "at", point_node (goal->x, goal->y));
  now = hl_plant_find_component (walk->now, goal->id);
  if (now->turn != goal->turn)
    set_of (walk, goal->id, FALSE, "turn", int_node (goal->turn));
  now = hl_plant_find_component (walk->now, goal->id);
  if (!now->is_mirrored != !goal->is_mirrored)
    set_of (walk, goal->id, FALSE, "mirror", json_node_init_boolean (json_node_alloc (), goal->is_mirrored));
}

static void
walk_stream (Walk *walk, const HlStream *goal)
{
  const HlStream *now = hl_plant_find_stream (walk->now, goal->id);
  if (now == NULL)
    {
      add_stream (walk, goal);
      return;
    }
  if (now->medium != goal->medium)
    set_of (walk, goal->id, TRUE, "medium", text_node (goal->medium));
  now = hl_plant_find_stream (walk->now, goal->id);
  if (now->n_route != goal->n_route || (now->n_route > 0 && memcmp (now->route, goal->route, now->n_route * sizeof (HlGridPoint)) != 0))
    set_of (walk, goal->id, TRUE, "route", route_node (goal));
  now = hl_plant_find_stream (walk->now, goal->id);
  if (!now->has_label_place != !goal->has_label_place
      || (now->has_label_place && (now->label_x != goal->label_x || now->label_y != goal->label_y)))
    set_of (walk, goal->id, TRUE, "label",
            goal->has_label_place ? point_node (goal->label_x, goal->label_y) : json_node_init_null (json_node_alloc ()));
}

static void
walk_shaft (Walk *walk, const HlShaft *goal)
{
  GString *text;
  if (same_joins (find_shaft (walk->now, goal->id), goal))
    return;
  text = g_string_new (NULL);
  hl_json_append_shaft (text, goal);
  take (walk, addition (text));
}

/* Values */

typedef void (*VisitValues) (Walk *walk, const HlValues *values, HlOwner owner, const char *id, gpointer data);

static void
visit_all (Walk *walk, const HlPlant *plant, VisitValues visit, gpointer data)
{
  visit (walk, hl_plant_values (plant), HL_OWNER_PLANT, "", data);
  for (guint i = 0; i < hl_plant_n_components (plant); i++)
    visit (walk, &hl_plant_component (plant, i)->values, HL_OWNER_COMPONENT, hl_plant_component (plant, i)->id, data);
  for (guint i = 0; i < hl_plant_n_streams (plant); i++)
    visit (walk, &hl_plant_stream (plant, i)->values, HL_OWNER_STREAM, hl_plant_stream (plant, i)->id, data);
}

static HlAddress
address_of (HlOwner owner, const char *id, const char *key)
{
  return (HlAddress) { owner, g_intern_string (id), g_intern_string (key) };
}

/* A value that the goal has under another name of the same state goes by itself once that one is set; but what came with an
 * addition is there already and will not be. */
static void
let_go (Walk *walk, const HlValues *values, HlOwner owner, const char *id, gpointer data)
{
  (void) data;
  for (guint i = 0; i < values->n; i++)
    {
      HlAddress address = address_of (owner, id, values->entries[i].key);
      HlAddress alias;
      const HlValue *goal = hl_plant_value_wherever (walk->goal, &address, &alias), *now;
      g_autofree char *where = NULL;
      now = goal != NULL ? hl_plant_value (walk->now, &alias) : NULL;
      if (goal != NULL && (hl_address_equal (&alias, &address) || now == NULL || !hl_value_equal (now, goal)))
        continue;
      where = hl_address_to_text (&address);
      take (walk, hl_change_new_set (where, json_node_init_null (json_node_alloc ()), NULL));
    }
}

static void
give (Walk *walk, const HlValues *values, HlOwner owner, const char *id, gpointer data)
{
  gboolean wants_ties = GPOINTER_TO_INT (data);
  for (guint i = 0; i < values->n; i++)
    {
      const HlValue *goal = &values->entries[i].value, *now;
      HlAddress address = address_of (owner, id, values->entries[i].key);
      g_autofree char *where = NULL, *tie = NULL;
      if ((goal->origin == HL_ORIGIN_TIED) != wants_ties)
        continue;
      now = hl_plant_value (walk->now, &address);
      if (now != NULL && hl_value_equal (now, goal))
        continue;
      where = hl_address_to_text (&address);
      tie = wants_ties ? hl_tie_to_text (goal) : NULL;
      take (walk, hl_change_new_set (where, wants_ties ? text_node (tie) : number_node (goal->value),
                                     goal->origin == HL_ORIGIN_ASSUMED ? "assumed" : NULL));
    }
}

GPtrArray *
hl_changes_between (const HlPlant *base, const HlPlant *plant)
{
  Walk walk = { g_ptr_array_new_with_free_func ((GDestroyNotify) hl_change_unref), NULL, plant };
  g_autoptr (HlPlant) shape = NULL;
  g_return_val_if_fail (base != NULL && plant != NULL, NULL);
  walk.now = hl_plant_ref ((HlPlant *) base);
  walk_site (&walk);
  walk_removals (&walk);
  for (guint i = 0; i < hl_plant_n_components (plant); i++)
    walk_component (&walk, hl_plant_component (plant, i));
  for (guint i = 0; i < hl_plant_n_streams (plant); i++)
    walk_stream (&walk, hl_plant_stream (plant, i));
  for (guint i = 0; i < hl_plant_n_shafts (plant); i++)
    walk_shaft (&walk, hl_plant_shaft (plant, i));
  shape = hl_plant_ref (walk.now);      /* values are visited as they stand here, while the walk lets them go */
  visit_all (&walk, shape, let_go, NULL);
  visit_all (&walk, plant, give, GINT_TO_POINTER (FALSE));
  visit_all (&walk, plant, give, GINT_TO_POINTER (TRUE));
  hl_plant_unref (walk.now);
  return walk.changes;
}

gboolean
hl_plant_differs_at (const HlPlant *a, const HlPlant *b, const HlAddress *address)
{
  const HlValue *first, *second;
  g_return_val_if_fail (a != NULL && b != NULL && address != NULL, FALSE);
  if (hl_plant_quantity_kind (a, address) == NULL || hl_plant_quantity_kind (b, address) == NULL)
    return FALSE;
  first = hl_plant_value_wherever (a, address, NULL);
  second = hl_plant_value_wherever (b, address, NULL);
  return (first == NULL) != (second == NULL) || (first != NULL && !hl_value_equal (first, second));
}
