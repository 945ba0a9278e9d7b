/* Pages of the report: heads, feet, headings, paragraphs.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "draw/report-private.h"
#include <cairo-pdf.h>
#include "draw/sheet-private.h"
#include "draw/text.h"
#include "plant/i18n.h"

#define MARGIN_LEFT   (22.0 * HL_MILLIMETRE)
#define MARGIN_RIGHT  (15.0 * HL_MILLIMETRE)
#define MARGIN_TOP    (24.0 * HL_MILLIMETRE)
#define MARGIN_BOTTOM (20.0 * HL_MILLIMETRE)
#define GUTTER        (10.0 * HL_MILLIMETRE)
#define LEADING       1.25
#define PAIR_NAME     (52.0 * HL_MILLIMETRE)

void
hl_report_bare_page (HlReport *report, double width, double height)
{
  if (report->page > 0)
    cairo_show_page (report->cr);
  report->page++;
  report->width = width;
  report->height = height;
  cairo_pdf_surface_set_size (report->surface, width * 0.75, height * 0.75);
  report->left = MARGIN_LEFT;
  report->right = width - MARGIN_RIGHT;
  report->top = MARGIN_TOP;
  report->bottom = height - MARGIN_BOTTOM;
  report->y = report->top;
  report->column = -1;
}

static void
rule (HlReport *report, double y, const HlColour *colour)
{
  hl_set_colour (report->cr, colour);
  cairo_set_dash (report->cr, NULL, 0, 0.0);
  cairo_set_line_width (report->cr, 0.8);
  cairo_move_to (report->cr, report->left, y);
  cairo_line_to (report->cr, report->right, y);
  cairo_stroke (report->cr);
}

void
hl_report_page (HlReport *report, gboolean is_landscape)
{
  const HlTheme *theme = &report->theme;
  const char *title;
  g_autofree char *number = NULL;
  double width;
  hl_report_bare_page (report, is_landscape ? report->page_height : report->page_width, is_landscape ? report->page_width : report->page_height);
  width = report->right - report->left;
  title = *hl_plant_title (report->plant) != '\0' ? hl_plant_title (report->plant) : _("Plant without a title");
  number = g_strdup_printf ("%d / %d", report->page, report->n_pages);
  hl_set_colour (report->cr, &theme->quiet);
  hl_text_show_within (report->cr, theme, title, report->left, 13.0 * HL_MILLIMETRE, 0.68 * width, -1, HL_REPORT_SMALL, FALSE);
  hl_text_show_within (report->cr, theme, _("Heat balance report"), report->right, 13.0 * HL_MILLIMETRE, 0.3 * width, 1, HL_REPORT_SMALL, FALSE);
  rule (report, 15.5 * HL_MILLIMETRE, &theme->hairline);
  rule (report, report->height - 15.0 * HL_MILLIMETRE, &theme->hairline);
  hl_set_colour (report->cr, &theme->quiet);
  hl_text_show_within (report->cr, theme, _("Concept figures only: not for construction, operation or purchase; local codes and licensed practice decide."),
                       report->left, report->height - 10.5 * HL_MILLIMETRE, width - 70.0, -1, HL_REPORT_SMALL - 0.8, FALSE);
  hl_text_show_within (report->cr, theme, number, report->right, report->height - 10.5 * HL_MILLIMETRE, 70.0, 1, HL_REPORT_SMALL, FALSE);
}

/* Into the left or right half of the page. */
static void
enter_column (HlReport *report, int column)
{
  double left = MARGIN_LEFT, right = report->width - MARGIN_RIGHT, half = (right - left - GUTTER) / 2.0;
  report->column = column;
  report->left = column == 0 ? left : right - half;
  report->right = column == 0 ? left + half : right;
  report->y = report->column_top;
}

void
hl_report_break (HlReport *report)
{
  gboolean were_two = report->column >= 0;
  report->lowest = MAX (report->lowest, report->y);
  if (report->column == 0)
    {
      enter_column (report, 1);
      return;
    }
  hl_report_page (report, report->width > report->height);
  if (!were_two)
    return;
  report->column_top = report->lowest = report->y;
  enter_column (report, 0);
}

void
hl_report_room (HlReport *report, double height)
{
  if (report->y + height > report->bottom)
    hl_report_break (report);
}

void
hl_report_columns (HlReport *report, gboolean are_two)
{
  if (are_two == (report->column >= 0))
    return;
  if (are_two)
    {
      report->column_top = report->lowest = report->y;
      enter_column (report, 0);
      return;
    }
  report->lowest = MAX (report->lowest, report->y);
  report->column = -1;
  report->left = MARGIN_LEFT;
  report->right = report->width - MARGIN_RIGHT;
  report->y = report->lowest;
}

/* What contents and bookmarks lead to. */
void
hl_report_mark (HlReport *report, const char *title, gboolean is_shown)
{
  HlReportSection section = { g_strdup (title), report->page };
  g_autofree char *name = g_strdup_printf ("name='section%u'", report->sections->len), *target = g_strdup_printf ("dest='section%u'", report->sections->len);
  g_array_append_val (report->sections, section);
  cairo_tag_begin (report->cr, CAIRO_TAG_DEST, name);
  if (is_shown)
    {
      hl_set_colour (report->cr, &report->theme.accent);
      hl_text_show_within (report->cr, &report->theme, title, report->left, report->y + HL_REPORT_HEAD, report->right - report->left, -1, HL_REPORT_HEAD, TRUE);
      report->y += 1.9 * HL_REPORT_HEAD;
    }
  cairo_tag_end (report->cr, CAIRO_TAG_DEST);
  cairo_pdf_surface_add_outline (report->surface, CAIRO_PDF_OUTLINE_ROOT, title, target, 0);
}

void
hl_report_section (HlReport *report, const char *title)
{
  g_autofree char *numbered = g_strdup_printf ("%u  %s", report->sections->len + 1, title);
  /* Not at the end of a page, where nothing of the section would follow. */
  if (report->y > report->top)
    {
      report->y += 1.6 * HL_REPORT_HEAD;
      hl_report_room (report, 9.0 * HL_REPORT_HEAD);
    }
  hl_report_mark (report, numbered, TRUE);
}

void
hl_report_heading (HlReport *report, const char *title)
{
  report->y += 0.6 * HL_REPORT_BODY;
  hl_report_room (report, 5.0 * HL_REPORT_BODY);
  hl_set_colour (report->cr, &report->theme.ink);
  hl_text_show_within (report->cr, &report->theme, title, report->left, report->y + HL_REPORT_BODY, report->right - report->left, -1, HL_REPORT_BODY + 0.6, TRUE);
  report->y += 1.75 * HL_REPORT_BODY;
}

/* Line by line, so that a long one breaks over pages. */
void
hl_report_paragraph (HlReport *report, const char *text, double size, gboolean is_bold, gboolean is_quiet)
{
  PangoLayout *layout = hl_text_layout (report->cr, &report->theme, text, size, is_bold);
  pango_layout_set_single_paragraph_mode (layout, FALSE);
  pango_layout_set_width (layout, (int) ((report->right - report->left) * PANGO_SCALE));
  pango_layout_set_wrap (layout, PANGO_WRAP_WORD_CHAR);
  for (int n = 0; n < pango_layout_get_line_count (layout); n++)
    {
      PangoLayoutLine *line = pango_layout_get_line_readonly (layout, n);
      hl_report_room (report, LEADING * size);
      hl_set_colour (report->cr, is_quiet ? &report->theme.quiet : &report->theme.ink);
      cairo_move_to (report->cr, report->left, report->y + size);
      pango_cairo_show_layout_line (report->cr, line);
      report->y += LEADING * size;
    }
  report->y += 0.45 * size;
  g_object_unref (layout);
}

void
hl_report_pair (HlReport *report, const char *name, const char *value)
{
  double height;
  hl_report_room (report, 3.2 * HL_REPORT_BODY);
  hl_set_colour (report->cr, &report->theme.quiet);
  hl_text_show_wrapped (report->cr, &report->theme, name, report->left, report->y, PAIR_NAME - 8.0, HL_REPORT_BODY, FALSE);
  hl_set_colour (report->cr, &report->theme.ink);
  height = hl_text_show_wrapped (report->cr, &report->theme, value, report->left + PAIR_NAME, report->y, report->right - report->left - PAIR_NAME,
                                 HL_REPORT_BODY, FALSE);
  report->y += MAX (height, 1.2 * HL_REPORT_BODY) + 0.35 * HL_REPORT_BODY;
}

void
hl_report_gap (HlReport *report, double height)
{
  report->y += height;
}
