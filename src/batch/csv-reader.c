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
  char    *line;              /* the record, raw, with its line ends */
  gsize    length, room;      /* without the last line end; allocated by getline() */
  char    *more;              /* further lines of a record with line ends inside quotes */
  gsize    more_room;
  GString *unquoted;          /* the fields' texts, each with a final NUL */
  GArray  *starts;            /* of gsize: where each field begins there */
  gulong   line_number, n_lines;
};

HlCsvReader *
hl_csv_reader_new (FILE *file)
{
  HlCsvReader *self = g_new0 (HlCsvReader, 1);
  self->file = file;
  self->unquoted = g_string_new (NULL);
  self->starts = g_array_new (FALSE, FALSE, sizeof (gsize));
  return self;
}

void
hl_csv_reader_free (HlCsvReader *self)
{
  /* getline() allocates with malloc(). */
  free (self->line);
  free (self->more);
  g_string_free (self->unquoted, TRUE);
  g_array_unref (self->starts);
  g_free (self);
}

static gboolean
has_open_quote (const char *text, gsize length)
{
  gboolean is_open = FALSE;
  for (const char *quote = text; (quote = memchr (quote, '"', length - (gsize) (quote - text))) != NULL; quote++)
    is_open = !is_open;
  return is_open;
}

/* Appends the next line to the record; FALSE at the end of the file. */
static gboolean
append_line (HlCsvReader *self)
{
  gssize n = getline (&self->more, &self->more_room, self->file);
  if (n < 0)
    return FALSE;
  self->n_lines++;
  gsize needed = self->length + (gsize) n + 1;
  if (needed > self->room)
    {
      self->room = MAX (needed, 2 * self->room);
      self->line = realloc (self->line, self->room);
      g_assert (self->line != NULL);
    }
  memcpy (self->line + self->length, self->more, (gsize) n + 1);
  self->length += (gsize) n;
  return TRUE;
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
  const char *end = self->line + self->length;
  for (const char *c = self->line; c < end; c++)
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

HlCsvOutcome
hl_csv_reader_next (HlCsvReader *self, GError **error)
{
  gssize n;
  do
    {
      errno = 0;
      n = getline (&self->line, &self->room, self->file);
      self->line_number = ++self->n_lines;
      if (n < 0)
        return ferror (self->file) ? fail (error, g_strerror (errno), self->line_number) : HL_CSV_END;
      /* A byte order mark is no part of the first column's name. */
      if (self->line_number == 1 && n >= 3 && memcmp (self->line, "\xef\xbb\xbf", 3) == 0)
        memmove (self->line, self->line + 3, (gsize) (n -= 3) + 1);
    }
  while (self->line[0] == '#' || self->line[strspn (self->line, " \t\r\n")] == '\0');

  self->length = (gsize) n;
  while (has_open_quote (self->line, self->length))
    {
      if (self->length > LONGEST_RECORD)
        return fail (error, _("a quote is not closed within 16 MiB"), self->line_number);
      if (!append_line (self))
        return fail (error, _("a quote is opened and never closed"), self->line_number);
    }
  while (self->length > 0 && (self->line[self->length - 1] == '\n' || self->line[self->length - 1] == '\r'))
    self->length--;
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
  *length = self->length;
  return self->line;
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
