/* Sections of the report on heat exchange and on exergy.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "draw/report-private.h"
#include "draw/bands.h"
#include "draw/exergy-bars.h"
#include "plant/i18n.h"

static HlUnitSet
units (const HlReport *report)
{
  return hl_plant_units (report->plant);
}

void
hl_report_exchangers (HlReport *report)
{
  g_autoptr (HlTable) table = hl_table_exchangers (report->solution, units (report));
  if (table->n_rows == 0 || !hl_solution_is_solved (report->solution))
    return;
  hl_report_page (report, TRUE);
  hl_report_section (report, _("Heat exchange"));
  hl_report_paragraph (report, _("Zones run from one change of phase to the next, in counterflow, the hot end first. UA is the sum of heat over logarithmic mean difference, part by part; the mean difference is heat over UA."),
                       HL_REPORT_SMALL, FALSE, TRUE);
  hl_report_table (report, table, NULL, (const int[]) { 0, 1, 2, 3, 4, 5, 6, 7, 8, 9, -1 }, HL_REPORT_SMALL - 0.6, NULL);
  report->y = report->bottom;
}

static void
write_pictures (HlReport *report)
{
  double width = report->right - report->left, height;
  hl_report_page (report, TRUE);
  hl_report_heading (report, _("Exergy bands"));
  height = MIN (report->bottom - report->y, 0.6 * width);
  if (!report->is_counting)
    {
      g_autoptr (HlBandsPicture) picture = hl_bands_picture_new_of (report->solution, HL_BANDS_EXERGY, units (report), width, height);
      cairo_save (report->cr);
      cairo_translate (report->cr, report->left, report->y);
      hl_bands_picture_draw (picture, report->cr, &report->theme, FALSE);
      cairo_restore (report->cr);
    }
  hl_report_page (report, TRUE);
  hl_report_heading (report, _("Exergy destroyed, bars"));
  height = MIN (report->bottom - report->y, 0.6 * width);
  if (!report->is_counting)
    {
      g_autoptr (HlExergyBars) bars = hl_exergy_bars_new (report->solution, units (report), width, height);
      cairo_save (report->cr);
      cairo_translate (report->cr, report->left, report->y);
      hl_exergy_bars_draw (bars, report->cr, &report->theme, FALSE);
      cairo_restore (report->cr);
    }
  /* What follows is text again. */
  hl_report_page (report, FALSE);
}

void
hl_report_exergy (HlReport *report)
{
  g_autoptr (HlTable) table = hl_table_exergy (report->solution, units (report));
  const HlSite *site = hl_plant_site (report->plant);
  g_autofree char *T = hl_units_format (site->dead_T, HL_DIMENSION_TEMPERATURE, units (report)), *p = hl_units_format (site->dead_p, HL_DIMENSION_PRESSURE, units (report));
  g_autofree char *words = NULL;
  if (table->n_rows == 0 || !hl_solution_is_solved (report->solution))
    return;
  hl_report_page (report, TRUE);
  hl_report_section (report, _("Exergy"));
  words = g_strdup_printf (_("Counted from a dead state of %s and %s. Spent: what the product of a component costs, its fuel; made: what it is there for; lost: what leaves for the surroundings unused; destroyed: dead state temperature times the entropy produced. Spent is made, lost and destroyed together. Valves, mixers, condensers and pipes make nothing."), T, p);
  hl_report_paragraph (report, words, HL_REPORT_SMALL, FALSE, TRUE);
  hl_report_table (report, table, NULL, (const int[]) { 0, 1, 2, 3, 4, 5, 6, 7, -1 }, HL_REPORT_SMALL - 0.2, NULL);
  write_pictures (report);
}
