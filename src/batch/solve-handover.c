/* heatloom-batch solve: what is handed over, beyond the plain picture and the ledger.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "batch/solve-output.h"
#include <math.h>
#include <string.h>
#include "draw/report.h"
#include "draw/sheet-paper.h"
#include "draw/tables.h"
#include "draw/xlsx.h"
#include "plant/i18n.h"

static gboolean
usage_error (GError **error, char *message)
{
  g_set_error_literal (error, HL_BATCH_ERROR, HL_BATCH_ERROR_USAGE, message);
  g_free (message);
  return FALSE;
}

/* @texts keeps what the fields point to. */
static gboolean
read_fields (const HlArguments *arguments, HlSheetFields *fields, GPtrArray *texts, GError **error)
{
  char *const *given;
  memset (fields, 0, sizeof *fields);
  for (guint n = 0; (given = hl_arguments_option (arguments, "field", n)) != NULL; n++)
    {
      const char *equals = strchr (given[0], '='), **field;
      g_autofree char *name = equals != NULL ? g_strndup (given[0], (gsize) (equals - given[0])) : NULL;
      if (!g_utf8_validate (given[0], -1, NULL) || name == NULL || (field = hl_sheet_field (fields, name)) == NULL)
        {
          g_autoptr (GString) all = g_string_new (NULL);
          for (guint k = 0; hl_sheet_field_id (k) != NULL; k++)
            g_string_append_printf (all, "%s%s", k > 0 ? ", " : "", hl_sheet_field_id (k));
          return usage_error (error, g_strdup_printf (_("--field needs NAME=TEXT with one of the names %s; got “%s”"), all->str, given[0]));
        }
      *field = g_strdup (equals + 1);
      g_ptr_array_add (texts, (char *) *field);
    }
  if (fields->variant == NULL)
    fields->variant = hl_arguments_value (arguments, "variant");
  return TRUE;
}

/* 0 where it is not given. */
static gboolean
read_scale (const HlArguments *arguments, double *scale, GError **error)
{
  const char *text = hl_arguments_value (arguments, "scale");
  char *end;
  *scale = 0.0;
  if (text == NULL)
    return TRUE;
  *scale = g_ascii_strtod (text, &end);
  if (end == text || *end != '\0' || !(*scale >= 0.05 && *scale <= 20.0))
    return usage_error (error, g_strdup_printf (_("--scale needs a number between 0.05 and 20, for instance 0.8; got “%s”"), text));
  return TRUE;
}

gboolean
hl_check_handover (const HlArguments *arguments, GError **error)
{
  g_autoptr (GPtrArray) texts = g_ptr_array_new_with_free_func (g_free);
  const char *paper_text = hl_arguments_value (arguments, "paper");
  HlSheetFields fields;
  HlPaper paper;
  double scale;
  g_autoptr (GError) failure = NULL;
  if (paper_text != NULL && !hl_paper_from_id (paper_text, &paper, &failure))
    return usage_error (error, g_strdup_printf ("--paper: %s", failure->message));
  if (paper_text != NULL && hl_arguments_value (arguments, "drawing") == NULL && hl_arguments_value (arguments, "report") == NULL)
    return usage_error (error, g_strdup (_("--paper needs --drawing FILE or --report FILE")));
  if (paper_text == NULL && hl_arguments_value (arguments, "scale") != NULL)
    return usage_error (error, g_strdup (_("--scale needs --paper SIZE")));
  return read_fields (arguments, &fields, texts, error) && read_scale (arguments, &scale, error);
}

static gboolean
write_summary (const HlSolution *solution, const char *path, GError **error)
{
  g_autoptr (HlTable) table = hl_table_summary (solution, hl_plant_units (hl_solution_plant (solution)));
  g_autofree char *csv = hl_table_csv (table);
  return hl_export_text_file (csv, path, error);
}

static gboolean
write_workbook (const HlSolution *solution, const HlComparison *comparison, const char *path, GError **error)
{
  g_autoptr (GBytes) bytes = hl_export_workbook_with (solution, comparison, hl_plant_units (hl_solution_plant (solution)), error);
  return bytes != NULL && hl_export_bytes_file (bytes, path, error);
}

static gboolean
write_sheet (const HlSolution *solution, const HlArguments *arguments, const HlSheetFields *fields, const char *path, GError **error)
{
  HlFormat format = HL_FORMAT_SVG;    /* of standard output, which has no ending */
  HlPaper paper;
  double scale;
  g_autoptr (GBytes) bytes = NULL;
  g_autoptr (GError) failure = NULL;
  if (!hl_paper_from_id (hl_arguments_value (arguments, "paper"), &paper, error) || !read_scale (arguments, &scale, error)
      || (strcmp (path, "-") != 0 && !hl_format_from_path (path, &format, error)))
    return FALSE;
  bytes = hl_export_sheet (solution, paper, fields, scale, format, &failure);
  if (g_error_matches (failure, G_IO_ERROR, G_IO_ERROR_INVALID_ARGUMENT))
    return usage_error (error, g_strdup_printf ("--scale: %s", failure->message));
  if (failure != NULL)
    g_propagate_error (error, g_steal_pointer (&failure));
  return bytes != NULL && hl_export_bytes_file (bytes, path, error);
}

static gboolean
write_report (const HlSolution *solution, const HlArguments *arguments, const HlSheetFields *fields, const char *path, GError **error)
{
  HlPaper paper = HL_PAPER_A3;
  g_autoptr (GBytes) bytes = NULL;
  if (hl_arguments_value (arguments, "paper") != NULL && !hl_paper_from_id (hl_arguments_value (arguments, "paper"), &paper, error))
    return FALSE;
  bytes = hl_export_report (solution, paper, fields, error);
  return bytes != NULL && hl_export_bytes_file (bytes, path, error);
}

gboolean
hl_write_handover (const HlSolution *solution, HlDocument *document, const HlArguments *arguments, GError **error)
{
  g_autoptr (GPtrArray) texts = g_ptr_array_new_with_free_func (g_free);
  const char *summary = hl_arguments_value (arguments, "summary"), *workbook = hl_arguments_value (arguments, "xlsx");
  const char *drawing = hl_arguments_value (arguments, "paper") != NULL ? hl_arguments_value (arguments, "drawing") : NULL;
  const char *report = hl_arguments_value (arguments, "report");
  gboolean has_variants = hl_document_n_variants (document) > 0 && (workbook != NULL || report != NULL);
  g_autoptr (HlComparison) comparison = has_variants ? hl_comparison_new (document, HL_DOCUMENT_BASE, FALSE, NULL) : NULL;
  HlSheetFields fields;
  if (!read_fields (arguments, &fields, texts, error))
    return FALSE;
  fields.comparison = comparison;
  return (summary == NULL || write_summary (solution, summary, error))
         && (workbook == NULL || write_workbook (solution, comparison, workbook, error))
         && (drawing == NULL || write_sheet (solution, arguments, &fields, drawing, error))
         && (report == NULL || write_report (solution, arguments, &fields, report, error));
}
