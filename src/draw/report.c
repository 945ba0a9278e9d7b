/* The report as a PDF file: two passes, the first to learn the pages of the contents.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "draw/report-private.h"
#include <cairo-pdf.h>
#include "draw/text.h"
#include "plant/i18n.h"

static void
clear_section (gpointer data)
{
  g_free (((HlReportSection *) data)->title);
}

static cairo_status_t
append_bytes (void *bytes, const unsigned char *data, unsigned int length)
{
  if (bytes != NULL)
    g_byte_array_append (bytes, data, length);
  return CAIRO_STATUS_SUCCESS;
}

static void
set_metadata (const HlReport *report)
{
  const char *title = hl_plant_title (report->plant);
  g_autofree char *words = g_strdup_printf ("%s: %s", *title != '\0' ? title : _("Plant without a title"), _("Heat balance report"));
  cairo_pdf_surface_set_metadata (report->surface, CAIRO_PDF_METADATA_TITLE, words);
  cairo_pdf_surface_set_metadata (report->surface, CAIRO_PDF_METADATA_SUBJECT,
                                  _("Concept figures only: not for construction, operation or purchase; local codes and licensed practice decide."));
  if (report->fields->drawn != NULL)
    cairo_pdf_surface_set_metadata (report->surface, CAIRO_PDF_METADATA_AUTHOR, report->fields->drawn);
  cairo_pdf_surface_set_metadata (report->surface, CAIRO_PDF_METADATA_CREATOR, "Heatloom " HL_VERSION);
  /* A fixed date: the same plant gives the same file on any day. */
  cairo_pdf_surface_set_metadata (report->surface, CAIRO_PDF_METADATA_CREATE_DATE, "2024-01-01T00:00:00Z");
}

/* @bytes NULL: only counts.  Returns the state of the surface. */
static cairo_status_t
write_pass (HlReport *report, GByteArray *bytes)
{
  cairo_status_t status;
  report->is_counting = bytes == NULL;
  report->page = 0;
  report->sections = g_array_new (FALSE, FALSE, sizeof (HlReportSection));
  g_array_set_clear_func (report->sections, clear_section);
  report->surface = cairo_pdf_surface_create_for_stream (append_bytes, bytes, report->page_width * 0.75, report->page_height * 0.75);
  set_metadata (report);
  report->cr = cairo_create (report->surface);
  cairo_scale (report->cr, 0.75, 0.75);
  hl_report_write (report);
  status = cairo_status (report->cr);
  cairo_show_page (report->cr);
  cairo_destroy (report->cr);
  cairo_surface_finish (report->surface);
  if (status == CAIRO_STATUS_SUCCESS)
    status = cairo_surface_status (report->surface);
  cairo_surface_destroy (report->surface);
  return status;
}

GBytes *
hl_export_report (const HlSolution *solution, HlPaper paper, const HlSheetFields *fields, GError **error)
{
  static const HlSheetFields none;
  HlReport report = { .theme = *hl_theme (HL_THEME_PAPER), .solution = solution, .fields = fields != NULL ? fields : &none, .paper = paper };
  g_autoptr (GByteArray) bytes = g_byte_array_new ();
  g_autoptr (GArray) contents = NULL;
  cairo_status_t status;
  g_return_val_if_fail (solution != NULL && paper < HL_N_PAPERS, NULL);
  report.theme.font = HL_EXPORT_FONT;
  report.plant = hl_solution_plant (solution);
  hl_paper_size (paper == HL_PAPER_LETTER || paper == HL_PAPER_TABLOID ? HL_PAPER_LETTER : HL_PAPER_A4, &report.page_height, &report.page_width);
  status = write_pass (&report, NULL);
  contents = report.sections;
  report.contents = contents;
  report.n_pages = report.page;
  if (status == CAIRO_STATUS_SUCCESS)
    {
      status = write_pass (&report, bytes);
      g_array_unref (report.sections);
    }
  if (status != CAIRO_STATUS_SUCCESS)
    {
      g_set_error (error, G_IO_ERROR, G_IO_ERROR_FAILED, _("the report could not be made: %s"), cairo_status_to_string (status));
      return NULL;
    }
  return g_byte_array_free_to_bytes (g_steal_pointer (&bytes));
}
