/* The rows of a comparison: what the variants change, their results, the duties, and notes.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "draw/variants-private.h"
#include <math.h>
#include "plant/i18n.h"

#define SAME 1e-9      /* relative; below what a solve means */

/* A text that lives as long as the comparison; takes it. */
static char *
keep (HlComparison *comparison, char *text)
{
  char *kept = g_string_chunk_insert (comparison->texts, text != NULL ? text : "");
  g_free (text);
  return kept;
}

static HlComparisonRow *
add_row (HlComparison *comparison, HlRowGroup group, const char *name, const char *key)
{
  HlComparisonRow row = { .group = group, .name = g_strdup (name), .key = g_strdup (key) };
  row.cells = g_new0 (HlComparisonCell, comparison->columns->len);
  for (guint i = 0; i < comparison->columns->len; i++)
    row.cells[i].text = row.cells[i].difference = (char *) "";
  g_array_append_val (comparison->rows, row);
  return &g_array_index (comparison->rows, HlComparisonRow, comparison->rows->len - 1);
}

static HlUnitSet
units_of (const HlComparison *comparison)
{
  return hl_plant_units (hl_column_plant (comparison, 0));
}

/* Changes */

static gboolean
has_row (const HlComparison *comparison, const char *key)
{
  for (guint i = 0; i < comparison->rows->len; i++)
    if (g_str_equal (hl_comparison_row (comparison, i)->key, key))
      return TRUE;
  return FALSE;
}

static gboolean
changes_here (const HlComparison *comparison, guint column, const HlChange *change)
{
  const GPtrArray *changes = hl_document_changes (comparison->document, (int) column - 1);
  for (guint i = 0; i < changes->len; i++)
    if (hl_change_kind (changes->pdata[i]) == hl_change_kind (change) && g_str_equal (hl_change_where (changes->pdata[i]), hl_change_where (change)))
      return TRUE;
  return FALSE;
}

/* What stands there in one column: what was put in, or what was found. */
static void
fill_quantity (HlComparison *comparison, HlComparisonCell *cell, guint column, const HlChange *change)
{
  HlPlant *plant = hl_column_plant (comparison, column);
  HlSolution *solution = hl_comparison_solution (comparison, column);
  const HlQuantityKind *kind;
  const HlValue *value;
  HlAddress address;
  if (!hl_change_address (change, plant, &address))
    return;
  kind = hl_plant_quantity_kind (plant, &address);
  value = hl_plant_value_wherever (plant, &address, NULL);
  if (value != NULL && value->origin != HL_ORIGIN_TIED)
    {
      cell->value = value->value;
      cell->is_known = TRUE;
    }
  else
    cell->is_known = hl_solution_is_solved (solution) && hl_solution_value (solution, &address, &cell->value) && isfinite (cell->value);
  if (!cell->is_known)
    return;
  cell->text = keep (comparison, hl_quantity_format (kind, cell->value, units_of (comparison)));
  if (value == NULL || value->origin == HL_ORIGIN_TIED)
    cell->text = keep (comparison, g_strdup_printf ("%s · %s", cell->text, hl_origin_name (value != NULL ? HL_ORIGIN_TIED : HL_ORIGIN_FOUND)));
}

static void
add_set (HlComparison *comparison, guint by, const HlChange *change)
{
  HlPlant *plant = hl_column_plant (comparison, by);
  g_autofree char *name = NULL;
  HlComparisonRow *row;
  HlAddress address;
  const HlQuantityKind *kind = NULL;
  if (hl_change_is_look (change) || g_str_has_suffix (hl_change_where (change), ".name") || has_row (comparison, hl_change_where (change)))
    return;                      /* neither a place nor a name changes the plant */
  name = hl_change_describe (change, hl_column_plant (comparison, 0), plant);
  row = add_row (comparison, HL_ROW_CHANGE, name, hl_change_where (change));
  if (hl_change_address (change, plant, &address))
    kind = hl_plant_quantity_kind (plant, &address);
  if (kind != NULL)
    {
      row->is_number = TRUE;
      row->dimension = kind->dimension;
      row->is_percent = (kind->flags & HL_QUANTITY_PERCENT) != 0;
    }
  for (guint i = 0; i < comparison->columns->len; i++)
    {
      HlComparisonCell *cell = &row->cells[i];
      cell->is_own = changes_here (comparison, i, change);
      if (kind != NULL)
        fill_quantity (comparison, cell, i, change);
      else
        cell->text = keep (comparison, hl_change_shown (change, hl_column_plant (comparison, i)));
    }
}

static gboolean
has_item (const HlPlant *plant, const char *id)
{
  for (guint i = 0; i < hl_plant_n_shafts (plant); i++)
    if (g_str_equal (hl_plant_shaft (plant, i)->id, id))
      return TRUE;
  return hl_plant_find_component (plant, id) != NULL || hl_plant_find_stream (plant, id) != NULL;
}

/* A stream that comes or goes with a component at its end says nothing new. */
static gboolean
follows_component (const HlPlant *with, const HlPlant *other, const char *id)
{
  const HlStream *stream = hl_plant_find_stream (with, id);
  return stream != NULL && (hl_plant_find_component (other, stream->from_id) == NULL || hl_plant_find_component (other, stream->to_id) == NULL);
}

static void
add_item (HlComparison *comparison, guint by, const HlChange *change)
{
  gboolean is_added = hl_change_kind (change) == HL_CHANGE_ADD;
  const HlPlant *base = hl_column_plant (comparison, 0), *plant = hl_column_plant (comparison, by);
  const HlPlant *with = is_added ? plant : base, *other = is_added ? base : plant;
  const char *id = hl_change_where (change);
  g_autofree char *key = g_strconcat ("item:", id, NULL), *name = NULL;
  const HlComponent *component = hl_plant_find_component (with, id);
  HlComparisonRow *row;
  if (has_row (comparison, key) || follows_component (with, other, id))
    return;
  if (component != NULL)
    name = g_strdup_printf ("%s %s", id, *component->name != '\0' ? component->name : _(component->kind->name));
  else if (hl_plant_find_stream (with, id) != NULL)
    name = g_strdup_printf (_("stream %s"), id);
  else
    name = g_strdup_printf (_("shaft %s"), id);
  row = add_row (comparison, HL_ROW_CHANGE, name, key);
  for (guint i = 0; i < comparison->columns->len; i++)
    {
      row->cells[i].is_own = changes_here (comparison, i, change);
      row->cells[i].text = keep (comparison, g_strdup (has_item (hl_column_plant (comparison, i), id) ? _("there") : "–"));
    }
}

static void
add_changes (HlComparison *comparison)
{
  for (guint column = 1; column < comparison->columns->len; column++)
    {
      const GPtrArray *changes = hl_document_changes (comparison->document, (int) column - 1);
      for (guint i = 0; i < changes->len; i++)
        if (hl_change_kind (changes->pdata[i]) != HL_CHANGE_SET)
          add_item (comparison, column, changes->pdata[i]);
        else
          add_set (comparison, column, changes->pdata[i]);
    }
}

/* Results */

static char *
difference_text (const HlComparisonRow *row, double difference, HlUnitSet units)
{
  HlDimension dimension = row->dimension == HL_DIMENSION_TEMPERATURE ? HL_DIMENSION_TEMPERATURE_DIFFERENCE
                          : row->dimension == HL_DIMENSION_PRESSURE ? HL_DIMENSION_PRESSURE_DIFFERENCE : row->dimension;
  g_autofree char *size = row->is_percent ? g_strdup_printf (_("%.2f points"), 100.0 * fabs (difference))
                                          : hl_units_format (fabs (difference), dimension, units);
  return g_strconcat (difference < 0.0 ? "−" : "+", size, NULL);
}

static void
add_differences (HlComparison *comparison, HlComparisonRow *row)
{
  const HlComparisonCell *reference = &row->cells[comparison->reference];
  for (guint i = 0; i < comparison->columns->len; i++)
    {
      HlComparisonCell *cell = &row->cells[i];
      if (i == comparison->reference || !cell->is_known || !reference->is_known
          || fabs (cell->value - reference->value) <= SAME * MAX (fabs (reference->value), fabs (cell->value)))
        continue;
      cell->is_own = TRUE;
      cell->difference = keep (comparison, difference_text (row, cell->value - reference->value, units_of (comparison)));
    }
}

/* The basis is told where two results have one name. */
static char *
result_name (const HlSummary *summary, const HlSummaryLine *line)
{
  guint n = 0;
  for (guint i = 0; i < hl_summary_n_lines (summary); i++)
    n += g_str_equal (hl_summary_line (summary, i)->name, line->name);
  return n > 1 && *line->basis != '\0' ? g_strdup_printf ("%s, %s", line->name, line->basis) : g_strdup (line->name);
}

static void
add_result (HlComparison *comparison, HlSummary *const *summaries, const HlSummary *own, const HlSummaryLine *line)
{
  g_autofree char *name = result_name (own, line);
  HlComparisonRow *row = add_row (comparison, HL_ROW_RESULT, name, line->key);
  row->is_number = TRUE;
  row->dimension = line->dimension;
  row->is_percent = line->is_percent;
  for (guint i = 0; i < comparison->columns->len; i++)
    {
      const HlSummaryLine *there = hl_summary_find (summaries[i], line->key);
      HlComparisonCell *cell = &row->cells[i];
      if (there == NULL)
        continue;
      cell->is_known = TRUE;
      cell->value = there->value;
      cell->text = keep (comparison, hl_summary_text (there, units_of (comparison)));
    }
  add_differences (comparison, row);
}

static char *
findings_text (const HlSolution *solution)
{
  static const char *const one[] = { N_("hint"), N_("caution"), N_("warning"), N_("error") };
  static const char *const many[] = { N_("hints"), N_("cautions"), N_("warnings"), N_("errors") };
  guint counts[4] = { 0 };
  GString *text = g_string_new (NULL);
  for (guint i = 0; i < hl_solution_n_findings (solution); i++)
    counts[MIN ((guint) hl_solution_finding (solution, i)->grade, 3)]++;
  for (int grade = 3; grade > 0; grade--)        /* hints are no result */
    if (counts[grade] > 0)
      g_string_append_printf (text, "%s%u %s", text->len > 0 ? ", " : "", counts[grade], _(counts[grade] > 1 ? many[grade] : one[grade]));
  return g_string_free (text, FALSE);
}

static void
add_results (HlComparison *comparison)
{
  guint n = comparison->columns->len;
  g_autofree HlSummary **summaries = g_new0 (HlSummary *, n);
  HlComparisonRow *row;
  for (guint i = 0; i < n; i++)
    summaries[i] = hl_summary_new (hl_comparison_compared (comparison, i));
  for (guint i = 0; i < n; i++)
    for (guint k = 0; k < hl_summary_n_lines (summaries[i]); k++)
      {
        const HlSummaryLine *line = hl_summary_line (summaries[i], k);
        if (!line->is_part && !has_row (comparison, line->key))
          add_result (comparison, summaries, summaries[i], line);
      }
  row = add_row (comparison, HL_ROW_RESULT, _("Findings"), "findings");
  for (guint i = 0; i < n; i++)
    {
      row->cells[i].text = keep (comparison, findings_text (hl_comparison_compared (comparison, i)));
      hl_summary_free (summaries[i]);
    }
}

/* Duties */

static const HlDuty *
duty_of (const HlComparison *comparison, guint column, guint n)
{
  const GArray *duties = g_array_index (comparison->columns, HlColumn, column).duties;
  return duties != NULL ? &g_array_index (duties, HlDuty, n) : NULL;
}

static void
add_duty (HlComparison *comparison, guint n, const HlDuty *duty)
{
  const HlPlant *plant = hl_column_plant (comparison, comparison->reference);
  const HlQuantityKind *kind = hl_plant_quantity_kind (plant, &duty->address);
  g_autofree char *name = hl_plant_describe (plant, &duty->address), *address = hl_address_to_text (&duty->address);
  g_autofree char *key = g_strconcat ("duty:", address, NULL);
  HlComparisonRow *row = add_row (comparison, HL_ROW_DUTY, name, key);
  row->is_number = TRUE;
  row->dimension = kind->dimension;
  for (guint i = 0; i < comparison->columns->len; i++)
    {
      const HlDuty *here = duty_of (comparison, i, n);
      HlComparisonCell *cell = &row->cells[i];
      cell->is_known = hl_solution_value (hl_comparison_compared (comparison, i), &duty->address, &cell->value) && isfinite (cell->value);
      if (cell->is_known)
        cell->text = keep (comparison, hl_quantity_format (kind, cell->value, units_of (comparison)));
      cell->is_own = here != NULL && !here->is_held;
      if (cell->is_own)
        g_ptr_array_add (comparison->notes, g_strdup_printf (_("%s: %s is not held at the reference's: %s"), hl_comparison_name (comparison, i), name, here->why_not));
      if (here != NULL && here->yielded != NULL)
        g_ptr_array_add (comparison->notes, g_strdup_printf (_("%s: at equal duty %s"), hl_comparison_name (comparison, i), here->yielded));
    }
}

static void
add_duties (HlComparison *comparison)
{
  guint any = comparison->reference > 0 || comparison->columns->len == 1 ? 0 : 1;
  const GArray *duties = g_array_index (comparison->columns, HlColumn, any).duties;
  if (duties != NULL && duties->len == 0)
    g_ptr_array_add (comparison->notes, g_strdup (_("The reference gives no flow, power or heat that could be held.")));
  for (guint n = 0; duties != NULL && n < duties->len; n++)
    add_duty (comparison, n, &g_array_index (duties, HlDuty, n));
}

/* Notes */

static void
note_column (HlComparison *comparison, guint column)
{
  const GPtrArray *unapplied = hl_document_unapplied (comparison->document, (int) column - 1);
  const HlSolution *solution = hl_comparison_solution (comparison, column);
  const char *name = hl_comparison_name (comparison, column);
  for (guint i = 0; i < unapplied->len; i++)
    {
      const HlUnapplied *left_out = unapplied->pdata[i];
      g_ptr_array_add (comparison->notes, g_strdup_printf (_("%s: the change of %s does not apply: %s"), name, hl_change_where (left_out->change), left_out->why));
    }
  if (!hl_solution_is_solved (solution))
    {
      g_autofree char *summary = hl_solution_summary (solution);
      g_ptr_array_add (comparison->notes, g_strdup_printf (_("%s has no solution: %s"), name, summary));
    }
}

void
hl_comparison_fill (HlComparison *comparison)
{
  add_changes (comparison);
  add_results (comparison);
  add_duties (comparison);
  for (guint column = 0; column < comparison->columns->len; column++)
    note_column (comparison, column);
}
