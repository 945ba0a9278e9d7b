/* CSV records from a stream through one buffer.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "batch/csv-reader.h"

#include <errno.h>
#include <string.h>
#include "batch/command.h"
#include "plant/i18n.h"

/* A record longer than this is not a table but a mistake. */
#define LONGEST_RECORD (16u << 20)

struct _HlCsvReader {
  FILE    *file;
  GString *line;              /* the record, raw; without its last line end once it is whole */
  GString *unquoted;          /* the fields' texts, each with a final NUL */
  GArray  *starts;            /* of gsize: where each field begins there */
  gulong   line_number, n_lines;
};

HlCsvReader *
hl_csv_reader_new (FILE *file)
{
  HlCsvReader *self = g_new0 (HlCsvReader, 1);
  self->file = file;
  self->line = g_string_new (NULL);
  self->unquoted = g_string_new (NULL);
  self->starts = g_array_new (FALSE, FALSE, sizeof (gsize));
  return self;
}

void
hl_csv_reader_free (HlCsvReader *self)
{
  g_string_free (self->line, TRUE);
  g_string_free (self->unquoted, TRUE);
  g_array_unref (self->starts);
  g_free (self);
}

static gboolean
has_odd_quotes (const char *text, gsize length)
{
  gboolean is_odd = FALSE;
  for (const char *quote = text; (quote = memchr (quote, '"', length - (gsize) (quote - text))) != NULL; quote++)
    is_odd = !is_odd;
  return is_odd;
}

typedef enum { LINE_READ, LINE_NONE, LINE_TOO_LONG } LineOutcome;

/* Appends the next line, with its end, to the record. */
static LineOutcome
append_line (HlCsvReader *self)
{
  char block[4096];
  gsize n = 0, start = self->line->len;
  int c;
  while ((c = getc_unlocked (self->file)) != EOF)
    {
      block[n++] = (char) c;
      if (n == sizeof block || c == '\n')
        {
          g_string_append_len (self->line, block, (gssize) n);
          n = 0;
        }
      if (c == '\n' || self->line->len > LONGEST_RECORD)
        break;
    }
  g_string_append_len (self->line, block, (gssize) n);
  if (self->line->len == start)
    return LINE_NONE;
  self->n_lines++;
  return self->line->len > LONGEST_RECORD ? LINE_TOO_LONG : LINE_READ;
}

static void
end_field (HlCsvReader *self, gsize start)
{
  g_string_append_c (self->unquoted, '\0');
  g_array_append_val (self->starts, start);
}

static void
split_fields (HlCsvReader *self)
{
  g_string_set_size (self->unquoted, 0);
  g_array_set_size (self->starts, 0);
  gsize start = 0;
  gboolean in_quotes = FALSE;
  const char *end = self->line->str + self->line->len;
  for (const char *c = self->line->str; c < end; c++)
    if (*c == '"' && in_quotes && c + 1 < end && c[1] == '"')
      g_string_append_c (self->unquoted, *c++);
    else if (*c == '"')
      in_quotes = !in_quotes;
    else if (*c == ',' && !in_quotes)
      {
        end_field (self, start);
        start = self->unquoted->len;
      }
    else
      g_string_append_c (self->unquoted, *c);
  end_field (self, start);
}

static HlCsvOutcome
fail (GError **error, const char *what, gulong line)
{
  g_set_error (error, HL_BATCH_ERROR, HL_BATCH_ERROR_CONTENT, _("line %lu: %s"), line, what);
  return HL_CSV_ERROR;
}

static void
drop_byte_order_mark (GString *line)
{
  if (g_str_has_prefix (line->str, "\xef\xbb\xbf"))
    g_string_erase (line, 0, 3);
}

static HlCsvOutcome
fail_line (HlCsvReader *self, LineOutcome outcome, gboolean in_quotes, GError **error)
{
  if (outcome == LINE_TOO_LONG)
    return fail (error, in_quotes ? _("a quote is not closed within 16 MiB") : _("the line is longer than 16 MiB; this is no table"),
                 self->line_number);
  if (ferror (self->file))
    return fail (error, g_strerror (errno), self->n_lines + 1);
  return in_quotes ? fail (error, _("a quote is opened and never closed"), self->line_number) : HL_CSV_END;
}

HlCsvOutcome
hl_csv_reader_next (HlCsvReader *self, GError **error)
{
  LineOutcome outcome;
  const char *text;
  do
    {
      g_string_set_size (self->line, 0);
      self->line_number = self->n_lines + 1;
      if ((outcome = append_line (self)) != LINE_READ)
        return fail_line (self, outcome, FALSE, error);
      /* It is no part of the first column's name. */
      if (self->line_number == 1)
        drop_byte_order_mark (self->line);
      text = self->line->str;
    }
  while (text[0] == '#' || text[strspn (text, " \t\r\n")] == '\0');

  gboolean in_quotes = has_odd_quotes (self->line->str, self->line->len);
  while (in_quotes)
    {
      gsize before = self->line->len;
      if ((outcome = append_line (self)) != LINE_READ)
        return fail_line (self, outcome, TRUE, error);
      in_quotes ^= has_odd_quotes (self->line->str + before, self->line->len - before);
    }
  gsize length = self->line->len;
  while (length > 0 && (self->line->str[length - 1] == '\n' || self->line->str[length - 1] == '\r'))
    length--;
  g_string_truncate (self->line, length);
  split_fields (self);
  return HL_CSV_RECORD;
}

gulong
hl_csv_reader_line (const HlCsvReader *self)
{
  return self->line_number;
}

guint
hl_csv_reader_n_fields (const HlCsvReader *self)
{
  return self->starts->len;
}

const char *
hl_csv_reader_field (const HlCsvReader *self, guint n)
{
  return self->unquoted->str + g_array_index (self->starts, gsize, n);
}

const char *
hl_csv_reader_raw (const HlCsvReader *self, gsize *length)
{
  *length = self->line->len;
  return self->line->str;
}

void
hl_csv_append_field (GString *text, const char *field)
{
  if (strpbrk (field, ",\"\r\n") == NULL)
    {
      g_string_append (text, field);
      return;
    }
  g_string_append_c (text, '"');
  for (const char *c = field; *c != '\0'; c++)
    {
      if (*c == '"')
        g_string_append_c (text, '"');
      g_string_append_c (text, *c);
    }
  g_string_append_c (text, '"');
}
