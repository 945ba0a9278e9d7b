/* Plants to JSON text, one item a line, and to files.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "plant/plant-private.h"
#include "plant/i18n.h"
#include <errno.h>
#include <stdlib.h>
#include <sys/stat.h>

/* Appends `"key": ` with a comma before it unless it is the first of its object. */
static void
key (GString *out, const char *name)
{
  gchar last = out->len > 0 ? out->str[out->len - 1] : '{';
  if (last != '{')
    g_string_append (out, ", ");
  hl_json_append_string (out, name);
  g_string_append (out, ": ");
}

static void
string_member (GString *out, const char *name, const char *text)
{
  key (out, name);
  hl_json_append_string (out, text);
}

static void
number_member (GString *out, const char *name, double number)
{
  g_autofree char *text = hl_number_to_text (number);
  key (out, name);
  g_string_append (out, text);
}

/* The values of one origin, when there are any. */
static void
values_of_origin (GString *out, const HlValues *values, HlOrigin origin)
{
  gboolean any = FALSE;
  for (guint i = 0; i < values->n; i++)
    {
      const HlValue *value = &values->entries[i].value;
      if (value->origin != origin)
        continue;
      if (!any)
        {
          key (out, hl_origin_id (origin));
          g_string_append_c (out, '{');
          any = TRUE;
        }
      if (origin == HL_ORIGIN_TIED)
        {
          g_autofree char *text = hl_tie_to_text (value);
          string_member (out, values->entries[i].key, text);
        }
      else
        number_member (out, values->entries[i].key, value->value);
    }
  if (any)
    g_string_append_c (out, '}');
}

static void
values_members (GString *out, const HlValues *values)
{
  values_of_origin (out, values, HL_ORIGIN_GIVEN);
  values_of_origin (out, values, HL_ORIGIN_ASSUMED);
  values_of_origin (out, values, HL_ORIGIN_TIED);
}

/* Keys that were not understood when the file was read. */
static void
extra_members (GString *out, JsonObject *extra)
{
  JsonObjectIter iter;
  const char *name;
  JsonNode *node;
  if (extra == NULL)
    return;
  json_object_iter_init_ordered (&iter, extra);
  while (json_object_iter_next_ordered (&iter, &name, &node))
    {
      key (out, name);
      hl_json_append_node (out, node);
    }
}

void
hl_json_append_component (GString *out, const HlComponent *component)
{
  g_string_append_c (out, '{');
  string_member (out, "id", component->id);
  string_member (out, "kind", component->kind->id);
  if (component->name[0] != '\0')
    string_member (out, "name", component->name);
  key (out, "at");
  g_string_append_printf (out, "[%d, %d]", component->x, component->y);
  if (component->turn != 0)
    {
      key (out, "turn");
      g_string_append_printf (out, "%d", component->turn);
    }
  if (component->is_mirrored)
    {
      key (out, "mirror");
      g_string_append (out, "true");
    }
  for (guint i = 0; i < component->kind->n_options; i++)
    {
      const HlOptionKind *option = &component->kind->options[i];
      if (option->choices != NULL)
        string_member (out, option->key, option->choices[component->options[i]]);
      else
        {
          key (out, option->key);
          g_string_append_printf (out, "%d", component->options[i]);
        }
    }
  values_members (out, &component->values);
  extra_members (out, component->extra);
  g_string_append_c (out, '}');
}

void
hl_json_append_stream (GString *out, const HlStream *stream)
{
  g_autofree char *from = g_strdup_printf ("%s.%s", stream->from_id, stream->from_port);
  g_autofree char *to = g_strdup_printf ("%s.%s", stream->to_id, stream->to_port);
  g_string_append_c (out, '{');
  string_member (out, "id", stream->id);
  string_member (out, "from", from);
  string_member (out, "to", to);
  string_member (out, "medium", stream->medium);
  if (stream->n_route > 0)
    {
      key (out, "route");
      g_string_append_c (out, '[');
      for (guint i = 0; i < stream->n_route; i++)
        g_string_append_printf (out, "%s[%d, %d]", i > 0 ? ", " : "", stream->route[i].x, stream->route[i].y);
      g_string_append_c (out, ']');
    }
  if (stream->has_label_place)
    {
      key (out, "label");
      g_string_append_printf (out, "[%d, %d]", stream->label_x, stream->label_y);
    }
  values_members (out, &stream->values);
  extra_members (out, stream->extra);
  g_string_append_c (out, '}');
}

void
hl_json_append_shaft (GString *out, const HlShaft *shaft)
{
  g_string_append_c (out, '{');
  string_member (out, "id", shaft->id);
  key (out, "joins");
  g_string_append_c (out, '[');
  for (guint i = 0; i < shaft->n_joins; i++)
    {
      if (i > 0)
        g_string_append (out, ", ");
      hl_json_append_string (out, shaft->joins[i]);
    }
  g_string_append_c (out, ']');
  extra_members (out, shaft->extra);
  g_string_append_c (out, '}');
}

typedef void (*WriteItem) (GString *out, gconstpointer item);

static void
write_list (GString *out, const char *name, const GPtrArray *list, WriteItem write)
{
  g_string_append (out, ",\n ");
  hl_json_append_string (out, name);
  g_string_append (out, ": [");
  for (guint i = 0; i < list->len; i++)
    {
      g_string_append (out, i > 0 ? ",\n  " : "\n  ");
      write (out, list->pdata[i]);
    }
  g_string_append_c (out, ']');
}

static void
write_site (GString *out, const HlPlant *plant)
{
  const HlSite *site = &plant->site;
  g_string_append (out, ",\n \"site\": {");
  number_member (out, "altitude", site->altitude);
  number_member (out, "ambient_T", site->ambient_T);
  number_member (out, "wet_bulb_T", site->wet_bulb_T);
  number_member (out, "dead_T", site->dead_T);
  number_member (out, "dead_p", site->dead_p);
  extra_members (out, plant->site_extra);
  g_string_append_c (out, '}');
}

/* Unknown keys of the top object: a list of objects or lists gets a line for each item. */
static void
write_top_extra (GString *out, JsonObject *extra)
{
  JsonObjectIter iter;
  const char *name;
  JsonNode *node;
  if (extra == NULL)
    return;
  json_object_iter_init_ordered (&iter, extra);
  while (json_object_iter_next_ordered (&iter, &name, &node))
    {
      JsonArray *array = JSON_NODE_HOLDS_ARRAY (node) ? json_node_get_array (node) : NULL;
      g_string_append (out, ",\n ");
      hl_json_append_string (out, name);
      g_string_append (out, ": ");
      if (array == NULL || json_array_get_length (array) == 0 || JSON_NODE_HOLDS_VALUE (json_array_get_element (array, 0)))
        {
          hl_json_append_node (out, node);
          continue;
        }
      g_string_append_c (out, '[');
      for (guint i = 0; i < json_array_get_length (array); i++)
        {
          g_string_append (out, i > 0 ? ",\n  " : "\n  ");
          hl_json_append_node (out, json_array_get_element (array, i));
        }
      g_string_append_c (out, ']');
    }
}

static void
write_dismissed (GString *out, const HlPlant *plant)
{
  guint n = hl_plant_n_dismissed (plant);
  for (guint k = 0; k < n; k++)
    {
      const HlDismissal *dismissal = hl_plant_dismissed (plant, k);
      g_autofree char *at = hl_dismissal_at_to_text (&dismissal->at);
      g_string_append (out, k == 0 ? ",\n \"dismissed\": [\n  {\"code\": " : ",\n  {\"code\": ");
      hl_json_append_string (out, dismissal->code);
      string_member (out, "at", at);
      extra_members (out, dismissal->extra);
      g_string_append_c (out, '}');
    }
  if (n > 0)
    g_string_append_c (out, ']');
}

void
hl_json_append_plant (GString *out, const HlPlant *plant)
{
  g_string_append (out, "{\"heatloom\": 1");
  string_member (out, "title", plant->title);
  string_member (out, "units", hl_unit_set_id (plant->units));
  string_member (out, "formulation", plant->formulation);
  write_site (out, plant);
  write_list (out, "components", plant->components, (WriteItem) hl_json_append_component);
  write_list (out, "streams", plant->streams, (WriteItem) hl_json_append_stream);
  write_list (out, "shafts", plant->shafts, (WriteItem) hl_json_append_shaft);
  g_string_append (out, ",\n \"plant\": {");
  values_members (out, &plant->values);
  extra_members (out, plant->plant_extra);
  g_string_append_c (out, '}');
  write_dismissed (out, plant);
  write_top_extra (out, plant->extra);
}

char *
hl_plant_to_json (const HlPlant *plant)
{
  GString *out;
  g_return_val_if_fail (plant != NULL, NULL);
  out = g_string_new (NULL);
  hl_json_append_plant (out, plant);
  g_string_append (out, "}\n");
  return g_string_free (out, FALSE);
}

gboolean
hl_json_save (const char *text, const char *path, GError **error)
{
  g_autofree char *target = NULL;
  g_autoptr (GError) local = NULL;
  struct stat old;
  gboolean existed;
  target = realpath (path, NULL);   /* the file behind a link is replaced, not the link */
  if (target == NULL)
    target = g_strdup (path);
  existed = stat (target, &old) == 0;
  if (!g_file_set_contents_full (target, text, -1, G_FILE_SET_CONTENTS_CONSISTENT | G_FILE_SET_CONTENTS_DURABLE,
                                 existed ? (int) (old.st_mode & 0777) : 0666, &local))
    {
      g_set_error (error, HL_PLANT_ERROR, HL_PLANT_ERROR_FILE, _("%s could not be saved: %s; choose another folder or free some space"), path, local->message);
      return FALSE;
    }
  /* The mode of a new file is cut by the umask, but one that was there keeps its permissions. */
  if (existed && chmod (target, old.st_mode & 0777) != 0)
    g_debug ("permissions of %s not kept: %s", target, g_strerror (errno));
  return TRUE;
}

gboolean
hl_plant_save (const HlPlant *plant, const char *path, GError **error)
{
  g_autofree char *text = NULL;
  g_return_val_if_fail (plant != NULL && path != NULL, FALSE);
  text = hl_plant_to_json (plant);
  return hl_json_save (text, path, error);
}
