/* Tables: their cells, and their forms as CSV and text.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "draw/tables-private.h"
#include <math.h>
#include <string.h>

#define BETWEEN "  "

HlTable *
hl_table_new (const char *title, guint n_columns, guint n_rows)
{
  HlTable *table = g_new0 (HlTable, 1);
  table->title = g_strdup (title);
  table->n_columns = n_columns;
  table->n_rows = n_rows;
  table->columns = g_new0 (HlTableColumn, n_columns);
  table->cells = g_new0 (HlTableCell, (gsize) n_columns * n_rows + 1);
  table->is_head = g_new0 (gboolean, n_rows + 1);
  for (guint i = 0; i < n_columns * n_rows; i++)
    {
      table->cells[i].text = g_strdup ("");
      table->cells[i].number = NAN;
    }
  return table;
}

void
hl_table_free (HlTable *table)
{
  if (table == NULL)
    return;
  for (guint i = 0; i < table->n_columns; i++)
    g_free (table->columns[i].heading);
  for (guint i = 0; i < table->n_columns * table->n_rows; i++)
    g_free (table->cells[i].text);
  g_free (table->columns);
  g_free (table->cells);
  g_free (table->is_head);
  g_free (table->title);
  g_free (table);
}

const HlTableCell *
hl_table_cell (const HlTable *table, guint row, guint column)
{
  g_return_val_if_fail (table != NULL && row < table->n_rows && column < table->n_columns, NULL);
  return &table->cells[row * table->n_columns + column];
}

HlTable *
hl_table_pick (const HlTable *table, const guint *rows, guint n)
{
  HlTable *picked;
  g_return_val_if_fail (table != NULL, NULL);
  picked = hl_table_new (table->title, table->n_columns, n);
  picked->has_parts = table->has_parts;
  for (guint column = 0; column < table->n_columns; column++)
    {
      hl_table_head (picked, column, table->columns[column].heading, table->columns[column].is_number);
      for (guint k = 0; k < n; k++)
        {
          HlTableCell *to = &picked->cells[k * table->n_columns + column];
          g_free (to->text);
          *to = *hl_table_cell (table, rows[k], column);
          to->text = g_strdup (to->text);
          picked->is_head[k] = table->is_head[rows[k]];
        }
    }
  return picked;
}

static HlTableCell *
cell (HlTable *table, guint row, guint column)
{
  return &table->cells[row * table->n_columns + column];
}

void
hl_table_head (HlTable *table, guint column, const char *heading, gboolean is_number)
{
  table->columns[column].heading = g_strdup (heading);
  table->columns[column].is_number = is_number;
}

void
hl_table_set_text (HlTable *table, guint row, guint column, const char *text)
{
  HlTableCell *c = cell (table, row, column);
  g_free (c->text);
  c->text = g_strdup (text != NULL ? text : "");
}

/* What one of @unit is in SI, of a unit that has no offset. */
static double
worth (const char *unit, HlDimension dimension, HlUnitSet units)
{
  g_autofree char *one = g_strconcat ("1 ", unit, NULL);
  double si;
  return hl_units_parse (one, dimension, units, 101325.0, &si, NULL) ? si : NAN;
}

const char *
hl_table_set_value (HlTable *table, guint row, guint column, double si, HlDimension dimension, gboolean is_percent, HlUnitSet units)
{
  HlTableCell *c = cell (table, row, column);
  const char *usual = hl_units_label (dimension, units), *label = hl_units_label_of (si, dimension, units), *point;
  g_autofree char *with_unit = NULL;
  if (!isfinite (si))
    return is_percent ? "%" : usual;
  g_free (c->text);
  if (is_percent)
    {
      c->number = 100.0 * si;
      c->text = g_strdup_printf ("%.2f", fabs (si) < 0.5e-4 ? 0.0 : 100.0 * si);
      label = "%";
    }
  else if (!g_str_equal (label, usual))
    {
      /* A small power in its smaller unit. */
      with_unit = hl_units_format (si, dimension, units);
      c->number = si / worth (label, dimension, units);
      c->text = g_strndup (with_unit, strcspn (with_unit, " "));
    }
  else
    {
      c->number = hl_units_to_display (si, dimension, units);
      c->text = hl_units_format_number (si, dimension, units);
    }
  point = strchr (c->text, '.');
  c->decimals = point != NULL ? (int) strlen (point + 1) : 0;
  return label;
}

/* RFC 4180, section 2, rules 5 to 7: quotes around what holds a comma, a quote or a line end; quotes inside doubled. */
static void
append_field (GString *csv, const char *text)
{
  if (strpbrk (text, ",\"\r\n") == NULL)
    {
      g_string_append (csv, text);
      return;
    }
  g_string_append_c (csv, '"');
  for (const char *c = text; *c != '\0'; c++)
    {
      if (*c == '"')
        g_string_append_c (csv, '"');
      g_string_append_c (csv, *c);
    }
  g_string_append_c (csv, '"');
}

/* Ten significant digits: what iteration and formulation mean, without the noise of the last bits; a point in every locale. */
static void
append_number (GString *csv, double number)
{
  char text[G_ASCII_DTOSTR_BUF_SIZE];
  if (isfinite (number))
    g_string_append (csv, g_ascii_formatd (text, sizeof text, "%.10g", number));
}

char *
hl_table_csv (const HlTable *table)
{
  GString *csv = g_string_new (NULL);
  g_return_val_if_fail (table != NULL, NULL);
  for (guint column = 0; column < table->n_columns; column++)
    {
      g_string_append (csv, column > 0 ? "," : "");
      append_field (csv, table->columns[column].heading);
    }
  g_string_append (csv, "\r\n");
  for (guint row = 0; row < table->n_rows; row++)
    {
      for (guint column = 0; column < table->n_columns; column++)
        {
          const HlTableCell *c = hl_table_cell (table, row, column);
          g_string_append (csv, column > 0 ? "," : "");
          if (isfinite (c->number))
            append_number (csv, c->number);
          else
            append_field (csv, c->text);
        }
      g_string_append (csv, "\r\n");
    }
  return g_string_free (csv, FALSE);
}

char *
hl_table_tabbed (const HlTable *table)
{
  GString *text = g_string_new (NULL);
  g_return_val_if_fail (table != NULL, NULL);
  for (guint line = 0; line <= table->n_rows; line++)
    {
      for (guint column = 0; column < table->n_columns; column++)
        g_string_append_printf (text, "%s%s", column > 0 ? "\t" : "",
                                line == 0 ? table->columns[column].heading : hl_table_cell (table, line - 1, column)->text);
      g_string_append_c (text, '\n');
    }
  return g_string_free (text, FALSE);
}

static void
append_cell (GString *text, const char *content, glong width, gboolean is_number, gsize *last)
{
  int room = (int) (width - g_utf8_strlen (content, -1));
  g_string_append_printf (text, "%*s%s", is_number ? room : 0, "", content);
  if (*content != '\0')
    *last = text->len;
  g_string_append_printf (text, "%*s", is_number ? 0 : room, "");
}

char *
hl_table_text (const HlTable *table)
{
  GString *text = g_string_new (NULL);
  g_autofree glong *widths = NULL;
  g_return_val_if_fail (table != NULL, NULL);
  widths = g_new0 (glong, table->n_columns);
  for (guint column = 0; column < table->n_columns; column++)
    {
      widths[column] = g_utf8_strlen (table->columns[column].heading, -1);
      for (guint row = 0; row < table->n_rows; row++)
        widths[column] = MAX (widths[column], g_utf8_strlen (hl_table_cell (table, row, column)->text, -1));
    }
  for (guint line = 0; line <= table->n_rows; line++)
    {
      gsize last = text->len;
      for (guint column = 0; column < table->n_columns; column++)
        {
          g_string_append (text, column > 0 ? BETWEEN : "");
          append_cell (text, line == 0 ? table->columns[column].heading : hl_table_cell (table, line - 1, column)->text,
                       widths[column], table->columns[column].is_number, &last);
        }
      g_string_truncate (text, last);
      g_string_append_c (text, '\n');
    }
  return g_string_free (text, FALSE);
}
