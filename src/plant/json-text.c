/* JSON text to nodes and back: strict, bounded, and with the line of each item.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "plant/plant-private.h"
#include "plant/i18n.h"
#include <math.h>
#include <string.h>

#define MAX_DEPTH  64
#define MAX_STRING 65536
#define MAX_VALUES 2000000

/* A parser of our own, as that of json-glib takes comments, trailing commas, numbers beyond a double and keys twice
 * without a word; the nodes are json-glib's. */
typedef struct {
  const char   *name, *at, *end, *line_start;
  guint         line, depth, n_values;
  HlJsonPlaces *places;
  GError      **error;
} Reader;

static gboolean read_value (Reader *reader, JsonNode **node, const char *top_key);

static gboolean
refuse (Reader *reader, const char *format, ...) G_GNUC_PRINTF (2, 3);
static gboolean
refuse (Reader *reader, const char *format, ...)
{
  g_autofree char *why = NULL;
  va_list arguments;
  va_start (arguments, format);
  why = g_strdup_vprintf (format, arguments);
  va_end (arguments);
  g_set_error (reader->error, HL_PLANT_ERROR, HL_PLANT_ERROR_SYNTAX, "%s:%u:%u: %s", reader->name, reader->line,
               (guint) (reader->at - reader->line_start) + 1, why);
  return FALSE;
}

static void
skip_space (Reader *reader)
{
  for (; reader->at < reader->end; reader->at++)
    if (*reader->at == '\n')
      {
        reader->line++;
        reader->line_start = reader->at + 1;
      }
    else if (*reader->at != ' ' && *reader->at != '\t' && *reader->at != '\r')
      return;
}

static gboolean
at_char (const Reader *reader, char c)
{
  return reader->at < reader->end && *reader->at == c;
}

static gboolean
refuse_here (Reader *reader, const char *wanted)
{
  if (reader->at >= reader->end)
    return refuse (reader, _("the file ends where %s must follow: it was cut short; use a backup, or complete it"), wanted);
  return refuse (reader, _("%s must stand here, not “%.1s”"), wanted, (guchar) *reader->at < 0x80 ? reader->at : "?");
}

static gboolean
read_hex (Reader *reader, gunichar *c)
{
  *c = 0;
  for (int i = 0; i < 4; i++, reader->at++)
    {
      if (reader->at >= reader->end || !g_ascii_isxdigit (*reader->at))
        return refuse_here (reader, _("a hexadecimal digit of \\u"));
      *c = *c * 16 + (gunichar) g_ascii_xdigit_value (*reader->at);
    }
  return TRUE;
}

static gboolean
read_unicode_escape (Reader *reader, GString *text)
{
  gunichar c, low;
  if (!read_hex (reader, &c))
    return FALSE;
  if (c >= 0xd800 && c < 0xdc00)
    {
      if (reader->end - reader->at < 2 || reader->at[0] != '\\' || reader->at[1] != 'u')
        return refuse (reader, _("half of a character: a low surrogate must follow"));
      reader->at += 2;
      if (!read_hex (reader, &low))
        return FALSE;
      if (low < 0xdc00 || low > 0xdfff)
        return refuse (reader, _("half of a character: a low surrogate must follow"));
      c = 0x10000 + ((c - 0xd800) << 10) + (low - 0xdc00);
    }
  else if (c == 0 || (c >= 0xdc00 && c < 0xe000))
    return refuse (reader, _("\\u%04x is no character of a text"), c);
  g_string_append_unichar (text, c);
  return TRUE;
}

static gboolean
read_escape (Reader *reader, GString *text)
{
  static const char marks[] = "\"\\/bfnrt", meanings[] = "\"\\/\b\f\n\r\t";
  const char *found;
  reader->at++;
  if (reader->at >= reader->end)
    return refuse_here (reader, _("the rest of a text"));
  if (*reader->at == 'u')
    {
      reader->at++;
      return read_unicode_escape (reader, text);
    }
  found = memchr (marks, *reader->at, sizeof marks - 1);
  if (found == NULL)
    return refuse_here (reader, _("an escape such as \\n or \\\""));
  g_string_append_c (text, meanings[found - marks]);
  reader->at++;
  return TRUE;
}

static gboolean
read_string (Reader *reader, char **string)
{
  g_autoptr (GString) text = g_string_new (NULL);
  if (!at_char (reader, '"'))
    return refuse_here (reader, _("a text in double quotes"));
  reader->at++;
  while (reader->at < reader->end && *reader->at != '"')
    {
      if ((guchar) *reader->at < 0x20)
        return refuse (reader, _("a text ends in the middle, or holds a control character; a quote is missing"));
      if (text->len > MAX_STRING)
        return refuse (reader, _("a text is longer than %d bytes"), MAX_STRING);
      if (*reader->at == '\\')
        {
          if (!read_escape (reader, text))
            return FALSE;
        }
      else
        g_string_append_c (text, *reader->at++);
    }
  if (reader->at >= reader->end)
    return refuse_here (reader, _("the rest of a text"));
  reader->at++;
  *string = g_strdup (text->str);
  return TRUE;
}

static gboolean
skip_digits (Reader *reader)
{
  const char *start = reader->at;
  while (reader->at < reader->end && g_ascii_isdigit (*reader->at))
    reader->at++;
  return reader->at > start;
}

static gboolean
read_number (Reader *reader, JsonNode **node)
{
  const char *start = reader->at;
  g_autofree char *text = NULL;
  gboolean is_whole = TRUE;
  gint64 whole;
  double number;
  if (at_char (reader, '-'))
    reader->at++;
  if (at_char (reader, '0'))
    reader->at++;
  else if (!skip_digits (reader))
    return refuse_here (reader, _("a value"));
  if (at_char (reader, '.'))
    {
      is_whole = FALSE;
      reader->at++;
      if (!skip_digits (reader))
        return refuse_here (reader, _("a digit"));
    }
  if (at_char (reader, 'e') || at_char (reader, 'E'))
    {
      is_whole = FALSE;
      reader->at++;
      if (at_char (reader, '+') || at_char (reader, '-'))
        reader->at++;
      if (!skip_digits (reader))
        return refuse_here (reader, _("a digit"));
    }
  text = g_strndup (start, (gsize) (reader->at - start));
  /* -0 is a number of its own that only a double can hold. */
  if (is_whole && !g_str_equal (text, "-0") && g_ascii_string_to_signed (text, 10, -(G_GINT64_CONSTANT (1) << 53), G_GINT64_CONSTANT (1) << 53, &whole, NULL))
    {
      *node = json_node_init_int (json_node_alloc (), whole);
      return TRUE;
    }
  number = g_ascii_strtod (text, NULL);
  if (!isfinite (number))
    return refuse (reader, _("the number %s is too large"), text);
  *node = json_node_init_double (json_node_alloc (), number);
  return TRUE;
}

static gboolean
read_word (Reader *reader, JsonNode **node)
{
  static const char *const words[] = { "true", "false", "null" };
  for (guint i = 0; i < G_N_ELEMENTS (words); i++)
    {
      gsize length = strlen (words[i]);
      if ((gsize) (reader->end - reader->at) < length || strncmp (reader->at, words[i], length) != 0)
        continue;
      reader->at += length;
      *node = i < 2 ? json_node_init_boolean (json_node_alloc (), i == 0) : json_node_init_null (json_node_alloc ());
      return TRUE;
    }
  return refuse_here (reader, _("a value"));
}

static gboolean
read_member (Reader *reader, JsonObject *object)
{
  g_autofree char *key = NULL;
  JsonNode *value = NULL;
  skip_space (reader);
  if (!read_string (reader, &key))
    return FALSE;
  if (json_object_has_member (object, key))
    return refuse (reader, _("the key “%s” stands twice in one object; remove one"), key);
  skip_space (reader);
  if (!at_char (reader, ':'))
    return refuse_here (reader, _("a colon"));
  reader->at++;
  if (!read_value (reader, &value, reader->depth == 1 ? key : NULL))
    return FALSE;
  json_object_set_member (object, key, value);
  return TRUE;
}

static gboolean
read_object (Reader *reader, JsonNode **node)
{
  g_autoptr (JsonObject) object = json_object_new ();
  reader->at++;
  skip_space (reader);
  if (at_char (reader, '}'))
    reader->at++;
  else
    for (;;)
      {
        if (!read_member (reader, object))
          return FALSE;
        skip_space (reader);
        if (at_char (reader, '}'))
          {
            reader->at++;
            break;
          }
        if (!at_char (reader, ','))
          return refuse_here (reader, _("a comma or }"));
        reader->at++;
      }
  *node = json_node_init_object (json_node_alloc (), object);
  return TRUE;
}

static void
note_line (Reader *reader, const char *top_key)
{
  GArray *lines = g_hash_table_lookup (reader->places->lines, top_key);
  if (lines == NULL)
    {
      lines = g_array_new (FALSE, FALSE, sizeof (guint));
      g_hash_table_insert (reader->places->lines, g_strdup (top_key), lines);
    }
  g_array_append_val (lines, reader->line);
}

static gboolean
read_array (Reader *reader, JsonNode **node, const char *top_key)
{
  g_autoptr (JsonArray) array = json_array_new ();
  reader->at++;
  skip_space (reader);
  if (at_char (reader, ']'))
    reader->at++;
  else
    for (;;)
      {
        JsonNode *item = NULL;
        skip_space (reader);
        if (top_key != NULL && reader->places != NULL)
          note_line (reader, top_key);
        if (!read_value (reader, &item, NULL))
          return FALSE;
        json_array_add_element (array, item);
        skip_space (reader);
        if (at_char (reader, ']'))
          {
            reader->at++;
            break;
          }
        if (!at_char (reader, ','))
          return refuse_here (reader, _("a comma or ]"));
        reader->at++;
      }
  *node = json_node_init_array (json_node_alloc (), array);
  return TRUE;
}

/* @top_key: key of the top object whose value this is; NULL elsewhere. */
static gboolean
read_value (Reader *reader, JsonNode **node, const char *top_key)
{
  char *text = NULL;
  gboolean ok;
  skip_space (reader);
  if (reader->at >= reader->end)
    return refuse_here (reader, _("a value"));
  if (++reader->n_values > MAX_VALUES)
    return refuse (reader, _("more than %d values; this is no plant file"), MAX_VALUES);
  if (reader->depth >= MAX_DEPTH)
    return refuse (reader, _("objects and lists are nested deeper than %d; this is no plant file"), MAX_DEPTH);
  reader->depth++;
  switch (*reader->at)
    {
    case '{':
      ok = read_object (reader, node);
      break;
    case '[':
      ok = read_array (reader, node, top_key);
      break;
    case '"':
      ok = read_string (reader, &text);
      if (ok)
        *node = json_node_init_string (json_node_alloc (), text);
      g_free (text);
      break;
    default:
      ok = *reader->at == '-' || g_ascii_isdigit (*reader->at) ? read_number (reader, node) : read_word (reader, node);
      break;
    }
  reader->depth--;
  return ok;
}

/* Line of a byte, from 1. */
static guint
line_of (const char *text, const char *at)
{
  guint line = 1;
  for (; text < at; text++)
    line += *text == '\n';
  return line;
}

JsonNode *
hl_json_parse (const char *text, gsize length, const char *name, HlJsonPlaces *places, GError **error)
{
  Reader reader = { name, text, text + length, text, 1, 0, 0, places, error };
  JsonNode *node = NULL;
  const char *bad = NULL;
  if (!g_utf8_validate_len (text, length, &bad))
    {
      g_set_error (error, HL_PLANT_ERROR, HL_PLANT_ERROR_SYNTAX, _("%s:%u: byte %lu is not UTF-8 text; this is no plant file, or it is damaged"),
                   name, line_of (text, bad), (gulong) (bad - text));
      return NULL;
    }
  if (length >= 3 && memcmp (text, "\xef\xbb\xbf", 3) == 0)   /* a byte order mark does no harm */
    reader.at = reader.line_start = text + 3;
  if (!read_value (&reader, &node, NULL))
    return NULL;
  skip_space (&reader);
  if (reader.at < reader.end)
    {
      refuse (&reader, _("something follows after the end of the plant; remove it"));
      json_node_unref (node);
      return NULL;
    }
  return node;
}

guint
hl_json_line (const HlJsonPlaces *places, const char *list, guint item)
{
  const GArray *lines = places->lines != NULL ? g_hash_table_lookup (places->lines, list) : NULL;
  return lines != NULL && item < lines->len ? g_array_index (lines, guint, item) : 0;
}

void
hl_json_append_string (GString *out, const char *text)
{
  g_string_append_c (out, '"');
  for (const char *at = text; *at != '\0'; at++)
    switch (*at)
      {
      case '"':
        g_string_append (out, "\\\"");
        break;
      case '\\':
        g_string_append (out, "\\\\");
        break;
      case '\n':
        g_string_append (out, "\\n");
        break;
      case '\t':
        g_string_append (out, "\\t");
        break;
      default:
        if ((guchar) *at < 0x20)
          g_string_append_printf (out, "\\u%04x", (guint) (guchar) *at);
        else
          g_string_append_c (out, *at);
        break;
      }
  g_string_append_c (out, '"');
}

static void
append_value (GString *out, JsonNode *node)
{
  g_autofree char *number = NULL;
  GType type = json_node_get_value_type (node);
  if (type == G_TYPE_STRING)
    hl_json_append_string (out, json_node_get_string (node));
  else if (type == G_TYPE_BOOLEAN)
    g_string_append (out, json_node_get_boolean (node) ? "true" : "false");
  else if (type == G_TYPE_INT64)
    g_string_append_printf (out, "%" G_GINT64_FORMAT, json_node_get_int (node));
  else
    {
      number = hl_number_to_text (json_node_get_double (node));
      g_string_append (out, number);
    }
}

void
hl_json_append_node (GString *out, JsonNode *node)
{
  switch (json_node_get_node_type (node))
    {
    case JSON_NODE_OBJECT:
      {
        JsonObjectIter iter;
        const char *key, *between = "";
        JsonNode *member;
        g_string_append_c (out, '{');
        json_object_iter_init_ordered (&iter, json_node_get_object (node));
        while (json_object_iter_next_ordered (&iter, &key, &member))
          {
            g_string_append (out, between);
            hl_json_append_string (out, key);
            g_string_append (out, ": ");
            hl_json_append_node (out, member);
            between = ", ";
          }
        g_string_append_c (out, '}');
        break;
      }
    case JSON_NODE_ARRAY:
      {
        JsonArray *array = json_node_get_array (node);
        g_string_append_c (out, '[');
        for (guint i = 0; i < json_array_get_length (array); i++)
          {
            if (i > 0)
              g_string_append (out, ", ");
            hl_json_append_node (out, json_array_get_element (array, i));
          }
        g_string_append_c (out, ']');
        break;
      }
    case JSON_NODE_VALUE:
      append_value (out, node);
      break;
    case JSON_NODE_NULL:
    default:
      g_string_append (out, "null");
      break;
    }
}

gboolean
hl_json_object_equal (JsonObject *a, JsonObject *b)
{
  g_autoptr (GString) text_a = g_string_new (NULL), text_b = g_string_new (NULL);
  JsonObject *objects[] = { a, b };
  GString *texts[] = { text_a, text_b };
  if (a == b)
    return TRUE;
  for (int i = 0; i < 2; i++)
    {
      g_autoptr (JsonObject) empty = json_object_new ();
      JsonNode *node = json_node_init_object (json_node_alloc (), objects[i] != NULL ? objects[i] : empty);
      hl_json_append_node (texts[i], node);
      json_node_unref (node);
    }
  return g_string_equal (text_a, text_b);
}
