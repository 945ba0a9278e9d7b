/* The workbook: a sheet a table, headings that stay, columns as wide as their words.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "draw/xlsx.h"
#include <glib/gstdio.h>
#include <locale.h>
#include <math.h>
#include <unistd.h>
#include <xlsxwriter.h>
#include "plant/i18n.h"

#define MOST_DECIMALS 7
#define WIDEST        70.0       /* characters; longer texts wrap */
#define FIXED_DATE    1704067200 /* 2024-01-01: the same plant gives the same file on any day */
#define FIRST_ROW     4          /* below title, caution and a blank line: headings, then the cells */

typedef struct {
  lxw_workbook *book;
  lxw_format   *title, *quiet, *heading, *text, *part, *head, *number[MOST_DECIMALS + 1], *head_number[MOST_DECIMALS + 1];
} Book;

/* Cells of a row begin at its top, where one of them wraps. */
static lxw_format *
cell_format (lxw_workbook *book, gboolean is_bold)
{
  lxw_format *format = workbook_add_format (book);
  format_set_align (format, LXW_ALIGN_VERTICAL_TOP);
  if (is_bold)
    format_set_bold (format);
  return format;
}

static void
make_formats (Book *book)
{
  book->title = cell_format (book->book, TRUE);
  format_set_font_size (book->title, 14.0);
  book->quiet = cell_format (book->book, FALSE);
  format_set_italic (book->quiet);
  book->heading = cell_format (book->book, TRUE);
  format_set_bottom (book->heading, LXW_BORDER_THIN);
  format_set_bg_color (book->heading, 0xEDF4F7);
  format_set_text_wrap (book->heading);
  book->text = cell_format (book->book, FALSE);
  format_set_text_wrap (book->text);
  book->part = cell_format (book->book, FALSE);
  format_set_indent (book->part, 1);
  book->head = cell_format (book->book, TRUE);
  format_set_text_wrap (book->head);
  for (int decimals = 0; decimals <= MOST_DECIMALS; decimals++)
    for (int is_bold = 0; is_bold < 2; is_bold++)
      {
        lxw_format *format = cell_format (book->book, is_bold);
        g_autofree char *pattern = g_strdup_printf ("0%s%.*s", decimals > 0 ? "." : "", decimals, "0000000");
        format_set_num_format (format, pattern);
        *(is_bold ? &book->head_number[decimals] : &book->number[decimals]) = format;
      }
}

static double
column_width (const HlTable *table, guint column)
{
  glong width = 6;
  /* A heading may break before its unit. */
  width = MAX (width, g_utf8_strlen (table->columns[column].heading, -1));
  for (guint row = 0; row < table->n_rows; row++)
    width = MAX (width, g_utf8_strlen (hl_table_cell (table, row, column)->text, -1));
  return MIN ((double) width * 1.1 + 1.0, WIDEST);
}

static void
write_cell (lxw_worksheet *sheet, const Book *book, const HlTable *table, guint row, guint column)
{
  const HlTableCell *cell = hl_table_cell (table, row, column);
  lxw_row_t at = FIRST_ROW + row;
  int decimals = CLAMP (cell->decimals, 0, MOST_DECIMALS);
  if (isfinite (cell->number))
    worksheet_write_number (sheet, at, (lxw_col_t) column, cell->number,
                            table->is_head[row] ? book->head_number[decimals] : book->number[decimals]);
  else if (*cell->text != '\0')
    worksheet_write_string (sheet, at, (lxw_col_t) column, cell->text,
                            table->is_head[row] ? book->head : table->has_parts && column == 1 ? book->part : book->text);
}

static gboolean
add_sheet (const Book *book, const HlTable *table, const char *plant, GError **error)
{
  /* A sheet's name has 31 characters at most. */
  g_autofree char *name = g_utf8_strlen (table->title, -1) > 31 ? g_utf8_substring (table->title, 0, 31) : g_strdup (table->title);
  lxw_worksheet *sheet = workbook_add_worksheet (book->book, name);
  g_autofree char *title = g_strdup_printf ("%s · %s", plant, table->title);
  if (sheet == NULL)
    {
      g_set_error (error, G_IO_ERROR, G_IO_ERROR_FAILED, _("the workbook could not be made: no sheet “%s”"), name);
      return FALSE;
    }
  worksheet_write_string (sheet, 0, 0, title, book->title);
  worksheet_write_string (sheet, 1, 0, _("Concept figures only: not for construction, operation or purchase; local codes and licensed practice decide."),
                          book->quiet);
  for (guint column = 0; column < table->n_columns; column++)
    {
      worksheet_set_column (sheet, (lxw_col_t) column, (lxw_col_t) column, column_width (table, column), NULL);
      worksheet_write_string (sheet, FIRST_ROW - 1, (lxw_col_t) column, table->columns[column].heading, book->heading);
    }
  for (guint row = 0; row < table->n_rows; row++)
    for (guint column = 0; column < table->n_columns; column++)
      write_cell (sheet, book, table, row, column);
  worksheet_freeze_panes (sheet, FIRST_ROW, 0);
  worksheet_repeat_rows (sheet, FIRST_ROW - 1, FIRST_ROW - 1);
  worksheet_set_landscape (sheet);
  worksheet_set_paper (sheet, 9);     /* A4 */
  worksheet_fit_to_pages (sheet, 1, 0);
  return TRUE;
}

static gboolean
fill_book (const Book *book, const HlSolution *solution, const HlComparison *comparison, HlUnitSet units, GError **error)
{
  const HlPlant *plant = hl_solution_plant (solution);
  const char *title = *hl_plant_title (plant) != '\0' ? hl_plant_title (plant) : _("Plant without a title");
  g_autoptr (HlTable) summary = hl_table_summary (solution, units), streams = hl_table_streams (solution, units);
  g_autoptr (HlTable) components = hl_table_components (solution, units), values = hl_table_values (solution, units, FALSE);
  g_autoptr (HlTable) findings = hl_table_findings (solution), variants = comparison != NULL ? hl_table_variants (comparison) : NULL;
  g_autoptr (HlTable) exergy = hl_table_exergy (solution, units), exchangers = hl_table_exchangers (solution, units);
  lxw_doc_properties properties = { .title = (char *) title, .comments = (char *) "Heatloom " HL_VERSION, .created = FIXED_DATE };
  workbook_set_properties (book->book, &properties);
  return add_sheet (book, summary, title, error) && add_sheet (book, streams, title, error) && add_sheet (book, components, title, error)
         && add_sheet (book, exchangers, title, error) && add_sheet (book, exergy, title, error)
         && add_sheet (book, values, title, error) && add_sheet (book, findings, title, error)
         && (variants == NULL || add_sheet (book, variants, title, error));
}

static gboolean
write_book (const char *path, const HlSolution *solution, const HlComparison *comparison, HlUnitSet units, GError **error)
{
  Book book = { .book = workbook_new (path) };
  lxw_error status;
  gboolean is_filled;
  if (book.book == NULL)
    {
      g_set_error (error, G_IO_ERROR, G_IO_ERROR_FAILED, _("the workbook could not be made: no memory or no temporary file"));
      return FALSE;
    }
  make_formats (&book);
  is_filled = fill_book (&book, solution, comparison, units, error);
  status = workbook_close (book.book);
  if (is_filled && status != LXW_NO_ERROR)
    g_set_error (error, G_IO_ERROR, G_IO_ERROR_FAILED, _("the workbook could not be made: %s"), lxw_strerror (status));
  return is_filled && status == LXW_NO_ERROR;
}

GBytes *
hl_export_workbook (const HlSolution *solution, HlUnitSet units, GError **error)
{
  return hl_export_workbook_with (solution, NULL, units, error);
}

GBytes *
hl_export_workbook_with (const HlSolution *solution, const HlComparison *comparison, HlUnitSet units, GError **error)
{
  g_autofree char *path = NULL, *content = NULL;
  gsize length = 0;
  gboolean is_done;
  locale_t points, before;
  int file;
  g_return_val_if_fail (solution != NULL, NULL);
  file = g_file_open_tmp ("heatloom-XXXXXX.xlsx", &path, error);
  if (file < 0)
    return NULL;
  close (file);
  /* Numbers in the file have points, whatever this program's locale. */
  points = newlocale (LC_NUMERIC_MASK, "C", (locale_t) 0);
  before = uselocale (points);
  is_done = write_book (path, solution, comparison, units, error);
  uselocale (before);
  freelocale (points);
  is_done = is_done && g_file_get_contents (path, &content, &length, error);
  g_unlink (path);
  return is_done ? g_bytes_new_take (g_steal_pointer (&content), length) : NULL;
}
