/* The ledger as CSV (RFC 4180): quoting, line ends, full precision.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "draw/export.h"
#include "draw/ledger.h"
#include <math.h>
#include <string.h>

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
append_number (GString *csv, double value, HlDimension dimension, HlUnitSet units)
{
  char text[G_ASCII_DTOSTR_BUF_SIZE];
  if (!isfinite (value))
    return;
  g_string_append (csv, g_ascii_formatd (text, sizeof text, "%.10g", hl_units_to_display (value, dimension, units)));
}

static void
append_cell (GString *csv, const HlSolution *solution, guint stream, guint column, HlUnitSet units)
{
  double value;
  g_autofree char *text = hl_ledger_cell (solution, stream, column, units, &value);
  if (hl_ledger_column (column)->is_text)
    append_field (csv, text);
  else
    append_number (csv, value, hl_ledger_column (column)->dimension, units);
}

char *
hl_ledger_csv (const HlSolution *solution, HlUnitSet units)
{
  GString *csv = g_string_new (NULL);
  guint n_streams;
  g_return_val_if_fail (solution != NULL, NULL);
  n_streams = hl_plant_n_streams (hl_solution_plant (solution));
  for (guint column = 0; column < hl_ledger_n_columns (); column++)
    {
      g_autofree char *heading = hl_ledger_heading (column, units);
      g_string_append (csv, column > 0 ? "," : "");
      append_field (csv, heading);
    }
  g_string_append (csv, "\r\n");
  for (guint stream = 0; stream < n_streams; stream++)
    {
      for (guint column = 0; column < hl_ledger_n_columns (); column++)
        {
          g_string_append (csv, column > 0 ? "," : "");
          append_cell (csv, solution, stream, column, units);
        }
      g_string_append (csv, "\r\n");
    }
  return g_string_free (csv, FALSE);
}
