/* The plant of a command: read from a file, with the values of --set.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "batch/plant-input.h"
#include <stdio.h>
#include <string.h>
#include "plant/circuit.h"
#include "plant/i18n.h"

#define LONGEST_INPUT (17u << 20)

HlDocument *
hl_input_document (const char *path, GError **error)
{
  if (strcmp (path, "-") != 0)
    return hl_document_load (path, error);

  g_autoptr(GString) text = g_string_new (NULL);
  char block[65536];
  gsize n;
  /* Beyond what any plant needs, the reader refuses what it has got. */
  while (text->len <= LONGEST_INPUT && (n = fread (block, 1, sizeof block, stdin)) > 0)
    g_string_append_len (text, block, (gssize) n);
  if (ferror (stdin))
    {
      g_set_error (error, HL_BATCH_ERROR, HL_BATCH_ERROR_CONTENT, _("standard input could not be read to the end"));
      return NULL;
    }
  return hl_document_from_json (text->str, (gssize) text->len, _("standard input"), error);
}

gboolean
hl_input_variant (const HlDocument *document, const HlArguments *arguments, const char *option, int *variant, GError **error)
{
  const char *name = hl_arguments_value (arguments, option);
  g_autoptr(GString) names = g_string_new (NULL);
  *variant = HL_DOCUMENT_BASE;
  if (name == NULL)
    return TRUE;
  *variant = hl_document_find_variant (document, name);
  if (*variant != HL_DOCUMENT_BASE)
    return TRUE;
  for (guint i = 0; i < hl_document_n_variants (document); i++)
    g_string_append_printf (names, "%s“%s”", i > 0 ? ", " : "", hl_document_variant_name (document, (int) i));
  if (names->len > 0)
    g_set_error (error, HL_BATCH_ERROR, HL_BATCH_ERROR_USAGE, _("--%s: this plant has no variant “%s”; it has %s"), option, name, names->str);
  else
    g_set_error (error, HL_BATCH_ERROR, HL_BATCH_ERROR_USAGE, _("--%s: this plant has no variants, so none is called “%s”"), option, name);
  return FALSE;
}

HlPlant *
hl_input_plant (const HlArguments *arguments, HlDocument **document_out, int *variant_out, HlExit *failure, GError **error)
{
  g_autoptr(HlDocument) document = hl_input_document (hl_arguments_word (arguments, 0), error);
  int variant;
  *failure = HL_EXIT_FILE;
  if (document == NULL)
    return NULL;
  *failure = HL_EXIT_USAGE;
  if (!hl_input_variant (document, arguments, "variant", &variant, error))
    return NULL;
  const GPtrArray *unapplied = hl_document_unapplied (document, variant);
  for (guint i = 0; i < unapplied->len; i++)
    {
      const HlUnapplied *left_out = unapplied->pdata[i];
      g_autofree char *text = g_strdup_printf (_("%s: the change of %s does not apply: %s"), hl_document_variant_name (document, variant),
                                               hl_change_where (left_out->change), left_out->why);
      fprintf (stderr, "heatloom-batch: %s\n", text);
    }
  HlPlant *plant = hl_plant_ref (hl_document_plant (document, variant));
  if (variant_out != NULL)
    *variant_out = variant;
  if (document_out != NULL)
    *document_out = g_steal_pointer (&document);
  return plant;
}

/* One --set, as if typed in the window: the value is given, and an assumed one may yield to it. */
static gboolean
set_value (HlPlant **plant, const char *text, GArray *yielded, GError **error)
{
  const char *equals = strchr (text, '=');
  if (!g_utf8_validate (text, -1, NULL) || equals == NULL || equals == text)
    {
      g_set_error (error, HL_BATCH_ERROR, HL_BATCH_ERROR_USAGE,
                   _("--set needs ADDRESS=VALUE, for instance 'T1.inlet.p=80 bar'; got “%s”"), text);
      return FALSE;
    }
  g_autofree char *name = g_strstrip (g_strndup (text, (gsize) (equals - text)));
  HlAddress address;
  HlValue value;
  if (!hl_address_parse (name, *plant, &address, error) || !hl_value_parse (*plant, &address, equals + 1, &value, error))
    return FALSE;
  g_autoptr(HlPlant) with_value = hl_plant_with_value (*plant, &address, &value, error);
  if (with_value == NULL)
    return FALSE;

  g_autoptr(GArray) now_yielded = NULL;
  HlPlant *settled = hl_settle (with_value, &address, &now_yielded);
  if (now_yielded != NULL && now_yielded->len > 0)
    g_array_append_vals (yielded, now_yielded->data, now_yielded->len);
  hl_plant_unref (*plant);
  *plant = settled;
  return TRUE;
}

/* One --medium: the whole circuit of a stream. */
static gboolean
set_medium (HlPlant **plant, const char *text, GError **error)
{
  const char *equals = strchr (text, '=');
  if (!g_utf8_validate (text, -1, NULL) || equals == NULL || equals == text)
    {
      g_set_error (error, HL_BATCH_ERROR, HL_BATCH_ERROR_USAGE, _("--medium needs STREAM=MEDIUM, for instance '1=isopentane'; got “%s”"), text);
      return FALSE;
    }
  g_autofree char *stream = g_strstrip (g_strndup (text, (gsize) (equals - text))), *medium = g_strstrip (g_strdup (equals + 1));
  HlPlant *changed = hl_plant_with_medium (*plant, stream, medium, error);
  if (changed == NULL)
    return FALSE;
  hl_plant_unref (*plant);
  *plant = changed;
  return TRUE;
}

gboolean
hl_input_values (HlPlant **plant, const HlArguments *arguments, GArray *yielded, GError **error)
{
  char *const *values;
  for (guint n = 0; (values = hl_arguments_option (arguments, "medium", n)) != NULL; n++)
    if (!set_medium (plant, values[0], error))
      {
        g_prefix_error (error, "--medium '%s': ", values[0]);
        return FALSE;
      }
  for (guint n = 0; (values = hl_arguments_option (arguments, "set", n)) != NULL; n++)
    if (!set_value (plant, values[0], yielded, error))
      {
        g_prefix_error (error, "--set '%s': ", values[0]);
        return FALSE;
      }
  return TRUE;
}
