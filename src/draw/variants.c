/* The variants of a document side by side: what is solved, and what can be read from it.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "draw/variants-private.h"
#include <math.h>
#include "plant/i18n.h"

static void
row_clear (gpointer data)
{
  HlComparisonRow *row = data;
  g_free (row->name);
  g_free (row->key);
  g_free (row->cells);      /* their texts belong to the comparison */
}

static void
column_clear (gpointer data)
{
  HlColumn *column = data;
  g_clear_pointer (&column->solution, hl_solution_unref);
  g_clear_pointer (&column->compared, hl_solution_unref);
  g_clear_pointer (&column->duties, g_array_unref);
}

HlPlant *
hl_column_plant (const HlComparison *comparison, guint column)
{
  return hl_document_plant (comparison->document, (int) column - 1);
}

/* What a former comparison has solved of the same plant. */
static HlSolution *
solved_before (const HlComparison *former, const HlPlant *plant)
{
  for (guint i = 0; former != NULL && i < former->columns->len; i++)
    {
      HlSolution *solution = g_array_index (former->columns, HlColumn, i).solution;
      if (hl_solution_plant (solution) == plant)
        return hl_solution_ref (solution);
    }
  return NULL;
}

static void
solve_columns (HlComparison *comparison, const HlComparison *former)
{
  const HlSolution *start = NULL;
  for (guint i = 0; i < comparison->columns->len; i++)
    {
      HlColumn *column = &g_array_index (comparison->columns, HlColumn, i);
      column->solution = solved_before (former, hl_column_plant (comparison, i));
      if (column->solution == NULL)
        column->solution = hl_solve (hl_column_plant (comparison, i), start);
      start = hl_solution_is_solved (column->solution) ? column->solution : start;
    }
}

static void
compare_columns (HlComparison *comparison)
{
  HlColumn *reference = &g_array_index (comparison->columns, HlColumn, comparison->reference);
  for (guint i = 0; i < comparison->columns->len; i++)
    {
      HlColumn *column = &g_array_index (comparison->columns, HlColumn, i);
      if (comparison->at_duty && (i != comparison->reference || comparison->columns->len == 1))
        column->compared = hl_solve_at_duty (column->solution, reference->solution, &column->duties);
      else
        column->compared = hl_solution_ref (column->solution);
    }
}

HlComparison *
hl_comparison_new (HlDocument *document, int reference, gboolean at_duty, const HlComparison *former)
{
  HlComparison *comparison;
  g_return_val_if_fail (document != NULL, NULL);
  g_return_val_if_fail (reference >= HL_DOCUMENT_BASE && reference < (int) hl_document_n_variants (document), NULL);
  comparison = g_new0 (HlComparison, 1);
  g_atomic_ref_count_init (&comparison->ref_count);
  comparison->document = hl_document_ref (document);
  comparison->reference = (guint) (reference + 1);
  comparison->at_duty = at_duty;
  comparison->columns = g_array_new (FALSE, TRUE, sizeof (HlColumn));
  g_array_set_clear_func (comparison->columns, column_clear);
  g_array_set_size (comparison->columns, hl_document_n_variants (document) + 1);
  comparison->rows = g_array_new (FALSE, TRUE, sizeof (HlComparisonRow));
  g_array_set_clear_func (comparison->rows, row_clear);
  comparison->texts = g_string_chunk_new (1024);
  comparison->notes = g_ptr_array_new_with_free_func (g_free);
  solve_columns (comparison, former);
  compare_columns (comparison);
  hl_comparison_fill (comparison);
  return comparison;
}

HlComparison *
hl_comparison_ref (HlComparison *comparison)
{
  g_return_val_if_fail (comparison != NULL, NULL);
  g_atomic_ref_count_inc (&comparison->ref_count);
  return comparison;
}

void
hl_comparison_unref (HlComparison *comparison)
{
  if (comparison == NULL || !g_atomic_ref_count_dec (&comparison->ref_count))
    return;
  g_array_unref (comparison->columns);
  g_array_unref (comparison->rows);
  g_string_chunk_free (comparison->texts);
  g_ptr_array_unref (comparison->notes);
  hl_document_unref (comparison->document);
  g_free (comparison);
}

guint
hl_comparison_n_columns (const HlComparison *comparison)
{
  g_return_val_if_fail (comparison != NULL, 0);
  return comparison->columns->len;
}

guint
hl_comparison_reference (const HlComparison *comparison)
{
  g_return_val_if_fail (comparison != NULL, 0);
  return comparison->reference;
}

const char *
hl_comparison_name (const HlComparison *comparison, guint column)
{
  g_return_val_if_fail (comparison != NULL && column < comparison->columns->len, NULL);
  return column == 0 ? C_("variant", "Base") : hl_document_variant_name (comparison->document, (int) column - 1);
}

HlSolution *
hl_comparison_solution (const HlComparison *comparison, guint column)
{
  g_return_val_if_fail (comparison != NULL && column < comparison->columns->len, NULL);
  return g_array_index (comparison->columns, HlColumn, column).solution;
}

HlSolution *
hl_comparison_compared (const HlComparison *comparison, guint column)
{
  g_return_val_if_fail (comparison != NULL && column < comparison->columns->len, NULL);
  return g_array_index (comparison->columns, HlColumn, column).compared;
}

guint
hl_comparison_n_rows (const HlComparison *comparison)
{
  g_return_val_if_fail (comparison != NULL, 0);
  return comparison->rows->len;
}

const HlComparisonRow *
hl_comparison_row (const HlComparison *comparison, guint row)
{
  g_return_val_if_fail (comparison != NULL && row < comparison->rows->len, NULL);
  return &g_array_index (comparison->rows, HlComparisonRow, row);
}

guint
hl_comparison_n_notes (const HlComparison *comparison)
{
  g_return_val_if_fail (comparison != NULL, 0);
  return comparison->notes->len;
}

const char *
hl_comparison_note (const HlComparison *comparison, guint n)
{
  g_return_val_if_fail (comparison != NULL && n < comparison->notes->len, NULL);
  return comparison->notes->pdata[n];
}

/* The table */

static const char *
group_name (HlRowGroup group)
{
  static const char *const names[] = { N_("Changed"), N_("Result"), N_("Duty") };
  return _(names[group]);
}

static void
fill_number (HlTable *table, guint row, guint column, const HlComparisonRow *line, double si, const char *sign, HlUnitSet units)
{
  HlTableCell *cell = (HlTableCell *) hl_table_cell (table, row, column);
  g_autofree char *text = line->is_percent ? g_strdup_printf ("%.2f", fabs (100.0 * si)) : hl_units_format_number (fabs (si), line->dimension, units);
  const char *point = strchr (text, '.');
  g_free (cell->text);
  cell->decimals = point != NULL ? (int) strlen (point + 1) : 0;
  cell->text = g_strconcat (si < 0.0 ? "-" : sign, text, NULL);
  cell->number = line->is_percent ? 100.0 * si : hl_units_to_display (si, line->dimension, units);
}

static HlDimension
of_difference (HlDimension dimension)
{
  return dimension == HL_DIMENSION_TEMPERATURE ? HL_DIMENSION_TEMPERATURE_DIFFERENCE
         : dimension == HL_DIMENSION_PRESSURE ? HL_DIMENSION_PRESSURE_DIFFERENCE : dimension;
}

static void
fill_row (const HlComparison *comparison, HlTable *table, guint row, HlUnitSet units)
{
  const HlComparisonRow *line = hl_comparison_row (comparison, row);
  HlComparisonRow difference = *line;
  guint n = hl_comparison_n_columns (comparison), at = 3 + n;
  difference.dimension = of_difference (line->dimension);
  hl_table_set_text (table, row, 0, group_name (line->group));
  hl_table_set_text (table, row, 1, line->name);
  hl_table_set_text (table, row, 2, !line->is_number ? "" : line->is_percent ? "%" : hl_units_label (line->dimension, units));
  for (guint i = 0; i < n; i++)
    {
      const HlComparisonCell *cell = &line->cells[i], *reference = &line->cells[comparison->reference];
      if (line->is_number && cell->is_known && (line->dimension == HL_DIMENSION_TEMPERATURE || cell->value >= 0.0 || line->is_percent))
        fill_number (table, row, 3 + i, line, cell->value, "", units);
      else
        hl_table_set_text (table, row, 3 + i, cell->text);
      if (i == comparison->reference)
        continue;
      if (*cell->difference != '\0')
        fill_number (table, row, at, &difference, cell->value - reference->value, "+", units);
      at++;
    }
}

HlTable *
hl_table_variants (const HlComparison *comparison)
{
  HlTable *table;
  guint n, at;
  HlUnitSet units;
  g_return_val_if_fail (comparison != NULL, NULL);
  n = hl_comparison_n_columns (comparison);
  units = hl_plant_units (hl_column_plant (comparison, 0));
  table = hl_table_new (_("Variants"), 3 + 2 * n - 1, comparison->rows->len + comparison->notes->len);
  hl_table_head (table, 0, _("Group"), FALSE);
  hl_table_head (table, 1, _("Quantity"), FALSE);
  hl_table_head (table, 2, _("Unit"), FALSE);
  at = 3 + n;
  for (guint i = 0; i < n; i++)
    {
      g_autofree char *heading = g_strdup_printf ("%s – %s", hl_comparison_name (comparison, i), hl_comparison_name (comparison, comparison->reference));
      hl_table_head (table, 3 + i, hl_comparison_name (comparison, i), TRUE);
      if (i != comparison->reference)
        hl_table_head (table, at++, heading, TRUE);
    }
  for (guint row = 0; row < comparison->rows->len; row++)
    fill_row (comparison, table, row, units);
  for (guint i = 0; i < comparison->notes->len; i++)
    {
      hl_table_set_text (table, comparison->rows->len + i, 0, _("Note"));
      hl_table_set_text (table, comparison->rows->len + i, 1, comparison->notes->pdata[i]);
    }
  return table;
}
