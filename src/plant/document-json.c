/* Documents to and from plant files: the base as before, the variants one change a line.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "plant/document-private.h"
#include "plant/i18n.h"

/* Reading */

static GPtrArray *
read_changes (HlReader *reader, JsonObject *object)
{
  g_autoptr (GPtrArray) changes = g_ptr_array_new_with_free_func ((GDestroyNotify) hl_change_unref);
  JsonArray *list = NULL;
  if (!hl_reader_list (reader, object, "changes", HL_MAX_CHANGES, &list))
    return NULL;
  for (guint i = 0; list != NULL && i < json_array_get_length (list); i++)
    {
      g_autofree char *path = g_strdup_printf ("changes[%u]", i);
      HlChange *change = hl_change_read (reader, path, json_array_get_element (list, i));
      if (change == NULL)
        return NULL;
      g_ptr_array_add (changes, change);
    }
  return g_steal_pointer (&changes);
}

static gboolean
read_variant (HlReader *reader, JsonNode *node, GPtrArray *variants)
{
  static const char *const known[] = { "name", "changes", NULL };
  JsonObject *object;
  const char *name = NULL;
  GError *why = NULL;
  GPtrArray *changes;
  if (!JSON_NODE_HOLDS_OBJECT (node))
    return hl_reader_refuse (reader, NULL, _("must be an object in { }, not %s"), hl_reader_type (node));
  object = json_node_get_object (node);
  if (!hl_reader_string (reader, object, "name", &name))
    return FALSE;
  if (name == NULL)
    return hl_reader_refuse (reader, "name", _("is missing; every variant needs one"));
  if (!hl_variant_name_is_good (name, &why))
    return hl_reader_refuse_with (reader, "name", why);
  reader->id = name;
  for (guint i = 0; i < variants->len; i++)
    if (g_str_equal (((HlVariant *) variants->pdata[i])->name, name))
      return hl_reader_refuse (reader, "name", _("another variant has this name already; rename one"));
  changes = read_changes (reader, object);
  if (changes == NULL)
    return FALSE;
  g_ptr_array_add (variants, hl_variant_new (name, changes, hl_reader_unknown (object, known, NULL)));
  return TRUE;
}

static gboolean
read_variants (HlReader *reader, JsonObject *top, gpointer data)
{
  GPtrArray *variants = data;
  JsonArray *list = NULL;
  if (!hl_reader_list (reader, top, "variants", HL_MAX_VARIANTS, &list))
    return FALSE;
  reader->list = "variants";
  for (guint i = 0; list != NULL && i < json_array_get_length (list); i++)
    {
      reader->item = i;
      reader->id = NULL;
      if (!read_variant (reader, json_array_get_element (list, i), variants))
        return FALSE;
    }
  return TRUE;
}

/* The plant alone keeps the variants as a key that it does not know; here they are known. */
static HlPlant *
without_variants (HlPlant *plant)
{
  static const char *const known[] = { "variants", NULL };
  HlPlant *edited;
  if (plant->extra == NULL || !json_object_has_member (plant->extra, "variants"))
    return plant;
  edited = hl_plant_share (plant);
  json_object_unref (edited->extra);
  edited->extra = hl_reader_unknown (plant->extra, known, NULL);
  hl_plant_unref (plant);
  return edited;
}

HlDocument *
hl_document_from_json (const char *text, gssize length, const char *name, GError **error)
{
  g_autoptr (GPtrArray) variants = g_ptr_array_new_with_free_func ((GDestroyNotify) hl_variant_unref);
  HlPlant *plant;
  g_return_val_if_fail (text != NULL, NULL);
  plant = hl_plant_read (text, length, name, read_variants, variants, error);
  return plant != NULL ? hl_document_build (without_variants (plant), g_steal_pointer (&variants), NULL) : NULL;
}

HlDocument *
hl_document_load (const char *path, GError **error)
{
  g_autofree char *name = NULL;
  g_autoptr (GByteArray) text = NULL;
  g_return_val_if_fail (path != NULL, NULL);
  text = hl_plant_load_text (path, &name, error);
  return text != NULL ? hl_document_from_json ((const char *) text->data, text->len - 1, name, error) : NULL;
}

/* Writing */

static void
append_variant (GString *out, const HlVariant *variant)
{
  JsonObjectIter iter;
  const char *key;
  JsonNode *node;
  g_string_append (out, "{\"name\": ");
  hl_json_append_string (out, variant->name);
  g_string_append (out, ", \"changes\": [");
  for (guint i = 0; i < variant->changes->len; i++)
    {
      g_string_append (out, i > 0 ? ",\n    " : "\n    ");
      hl_change_append (out, variant->changes->pdata[i]);
    }
  g_string_append_c (out, ']');
  if (variant->extra != NULL)
    {
      json_object_iter_init_ordered (&iter, variant->extra);
      while (json_object_iter_next_ordered (&iter, &key, &node))
        {
          g_string_append (out, ", ");
          hl_json_append_string (out, key);
          g_string_append (out, ": ");
          hl_json_append_node (out, node);
        }
    }
  g_string_append_c (out, '}');
}

char *
hl_document_to_json (const HlDocument *document)
{
  GString *out = g_string_new (NULL);
  g_return_val_if_fail (document != NULL, NULL);
  hl_json_append_plant (out, document->base);
  if (document->variants->len > 0)
    g_string_append (out, ",\n \"variants\": [");
  for (guint i = 0; i < document->variants->len; i++)
    {
      g_string_append (out, i > 0 ? ",\n  " : "\n  ");
      append_variant (out, document->variants->pdata[i]);
    }
  g_string_append (out, document->variants->len > 0 ? "]}\n" : "}\n");
  return g_string_free (out, FALSE);
}

gboolean
hl_document_save (const HlDocument *document, const char *path, GError **error)
{
  g_autofree char *text = NULL;
  g_return_val_if_fail (document != NULL && path != NULL, FALSE);
  text = hl_document_to_json (document);
  return hl_json_save (text, path, error);
}
