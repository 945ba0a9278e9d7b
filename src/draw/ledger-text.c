/* The ledger as plain text in aligned columns, for terminals, mails and notes.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "draw/export.h"
#include "draw/ledger.h"
#include "plant/i18n.h"
#include <string.h>

#define BETWEEN "  "

/* Names in the first line, units in the second, then a line for each stream. */
typedef struct {
  guint  n_lines, n_columns;
  char **cells;               /* [n_lines n_columns] */
  glong *widths;              /* [n_columns] characters */
} Table;

static char **
cell (Table *table, guint line, guint column)
{
  return &table->cells[line * table->n_columns + column];
}

static Table
fill (const HlSolution *solution, HlUnitSet units)
{
  Table table = { hl_plant_n_streams (hl_solution_plant (solution)) + 2, hl_ledger_n_columns (), NULL, NULL };
  table.cells = g_new0 (char *, table.n_lines * table.n_columns);
  table.widths = g_new0 (glong, table.n_columns);
  for (guint column = 0; column < table.n_columns; column++)
    {
      const HlLedgerColumn *kind = hl_ledger_column (column);
      *cell (&table, 0, column) = g_strdup (_(kind->name));
      *cell (&table, 1, column) = g_strdup (kind->is_text ? "" : hl_units_label (kind->dimension, units));
      for (guint line = 2; line < table.n_lines; line++)
        *cell (&table, line, column) = hl_ledger_cell (solution, line - 2, column, units, NULL);
      for (guint line = 0; line < table.n_lines; line++)
        table.widths[column] = MAX (table.widths[column], g_utf8_strlen (*cell (&table, line, column), -1));
    }
  return table;
}

/* Words start together, numbers end together; no blanks at the end of a line. */
static void
append_line (GString *text, Table *table, guint line)
{
  gsize last = text->len;
  for (guint column = 0; column < table->n_columns; column++)
    {
      const char *content = *cell (table, line, column);
      int room = (int) (table->widths[column] - g_utf8_strlen (content, -1));
      gboolean is_text = hl_ledger_column (column)->is_text;
      g_string_append_printf (text, "%s%*s%s", column > 0 ? BETWEEN : "", is_text ? 0 : room, "", content);
      if (*content != '\0')
        last = text->len;
      g_string_append_printf (text, "%*s", is_text ? room : 0, "");
    }
  g_string_truncate (text, last);
  g_string_append_c (text, '\n');
}

char *
hl_ledger_text (const HlSolution *solution, HlUnitSet units)
{
  GString *text = g_string_new (NULL);
  Table table;
  g_return_val_if_fail (solution != NULL, NULL);
  table = fill (solution, units);
  for (guint line = 0; line < table.n_lines; line++)
    append_line (text, &table, line);
  for (guint i = 0; i < table.n_lines * table.n_columns; i++)
    g_free (table.cells[i]);
  g_free (table.cells);
  g_free (table.widths);
  return g_string_free (text, FALSE);
}
