/* Reads tables of expected values for tests.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "csv.h"

#include <math.h>
#include <stdarg.h>
#include <string.h>

struct _Csv {
  char      *name;
  GStrv      columns;
  GPtrArray *rows;      /* GStrv each, as long as columns */
};

Csv *
csv_parse (const char *text, const char *name)
{
  Csv *csv = g_new0 (Csv, 1);
  csv->name = g_strdup (name);
  csv->rows = g_ptr_array_new_with_free_func ((GDestroyNotify) g_strfreev);
  g_auto (GStrv) lines = g_strsplit (text, "\n", -1);
  for (gsize i = 0; lines[i] != NULL; i++)
    {
      const char *line = g_strchomp (lines[i]);
      if (line[0] == '\0' || line[0] == '#')
        continue;
      g_auto (GStrv) cells = g_strsplit (line, ",", -1);
      if (csv->columns == NULL)
        csv->columns = g_steal_pointer (&cells);
      else if (g_strv_length (cells) == g_strv_length (csv->columns))
        g_ptr_array_add (csv->rows, g_steal_pointer (&cells));
      else
        g_error ("%s: line %" G_GSIZE_FORMAT " has another number of cells than the header", name, i + 1);
    }
  if (csv->columns == NULL || csv->rows->len == 0)
    g_error ("%s: no rows", name);
  return csv;
}

Csv *
csv_read (const char *first_element, ...)
{
  va_list args;
  g_autoptr (GPtrArray) elements = g_ptr_array_new ();
  g_ptr_array_add (elements, (gpointer) g_test_get_dir (G_TEST_DIST));
  va_start (args, first_element);
  for (const char *e = first_element; e != NULL; e = va_arg (args, const char *))
    g_ptr_array_add (elements, (gpointer) e);
  va_end (args);
  g_ptr_array_add (elements, NULL);
  g_autofree char *path = g_build_filenamev ((char **) elements->pdata);

  g_autofree char *text = NULL;
  g_autoptr (GError) error = NULL;
  if (!g_file_get_contents (path, &text, NULL, &error))
    g_error ("%s", error->message);
  return csv_parse (text, path);
}

void
csv_free (Csv *csv)
{
  if (csv == NULL)
    return;
  g_free (csv->name);
  g_strfreev (csv->columns);
  g_ptr_array_unref (csv->rows);
  g_free (csv);
}

guint
csv_n_rows (const Csv *csv)
{
  return csv->rows->len;
}

gboolean
csv_has_column (const Csv *csv, const char *column)
{
  return g_strv_contains ((const char *const *) csv->columns, column);
}

const char *
csv_text (const Csv *csv, guint row, const char *column)
{
  g_assert_cmpuint (row, <, csv->rows->len);
  for (gsize i = 0; csv->columns[i] != NULL; i++)
    if (strcmp (csv->columns[i], column) == 0)
      return ((GStrv) g_ptr_array_index (csv->rows, row))[i];
  g_error ("%s: no column \"%s\"", csv->name, column);
}

gboolean
csv_is_empty (const Csv *csv, guint row, const char *column)
{
  return csv_text (csv, row, column)[0] == '\0';
}

double
csv_number (const Csv *csv, guint row, const char *column)
{
  const char *text = csv_text (csv, row, column);
  char *end;
  double value = g_ascii_strtod (text, &end);
  if (end == text || *end != '\0')
    g_error ("%s: row %u, %s: \"%s\" is no number", csv->name, row + 1, column, text);
  return value;
}

double
csv_last_digit (const Csv *csv, guint row, const char *column)
{
  const char *text = csv_text (csv, row, column);
  const char *exponent = strpbrk (text, "Ee"), *point = strchr (text, '.');
  gsize mantissa = exponent != NULL ? (gsize) (exponent - text) : strlen (text);
  int decimals = point != NULL ? (int) (mantissa - (point - text) - 1) : 0;
  return pow (10.0, (exponent != NULL ? (int) g_ascii_strtoll (exponent + 1, NULL, 10) : 0) - decimals);
}

void
csv_assert_prints_at (const char *where, const Csv *csv, guint row, const char *column, double value, double units)
{
  double expected = csv_number (csv, row, column), digit = csv_last_digit (csv, row, column);
  /* Written so that NaN fails; the little more is the rounding of the difference itself. */
  if (!(fabs (value - expected) <= units * digit * (1.0 + 1e-6)))
    g_error ("%s: %s: row %u, %s: got %.15g, the table prints %s", where, csv->name, row + 1, column, value,
             csv_text (csv, row, column));
}

void
csv_assert_near_at (const char *where, const Csv *csv, guint row, const char *column, double value, double relative)
{
  double expected = csv_number (csv, row, column);
  if (!(fabs (value - expected) <= relative * fabs (expected)))
    g_error ("%s: %s: row %u, %s: got %.15g, expected %.15g, relative difference %.2g above %.2g", where, csv->name,
             row + 1, column, value, expected, fabs (value / expected - 1.0), relative);
}
