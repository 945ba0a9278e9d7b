/* What stands in the report, section by section.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "draw/report-private.h"
#include <math.h>
#include <string.h>
#include "draw/sheet-private.h"
#include "draw/state-diagram.h"
#include "draw/text.h"
#include "plant/circuit.h"
#include "plant/i18n.h"

#define COVER_TITLE    30.0
#define COVER_SUBTITLE 17.0
#define BOX_PADDING    14.0
#define DIAGRAM_SHARE  0.62      /* height over width of the state diagram */

static const char *
plant_title (const HlReport *report)
{
  return *hl_plant_title (report->plant) != '\0' ? hl_plant_title (report->plant) : _("Plant without a title");
}

static HlUnitSet
units (const HlReport *report)
{
  return hl_plant_units (report->plant);
}

/* A frame around what is to be read before all else. */
static void
caution_box (HlReport *report)
{
  double x = report->left + BOX_PADDING, y = report->y + BOX_PADDING, width = report->right - report->left - 2.0 * BOX_PADDING;
  hl_set_colour (report->cr, &report->theme.ink);
  y += hl_text_show_wrapped (report->cr, &report->theme, _("Caution"), x, y, width, HL_REPORT_BODY + 1.0, TRUE) + 4.0;
  y += hl_text_show_wrapped (report->cr, &report->theme,
                             _("The figures of this report serve concepts and comparisons. They are no design of pressure equipment, no safety case and no "
                               "guarantee of performance. Steam, hot water and pressure kill; many working fluids burn or poison. Local codes and licensed "
                               "practice decide what may be built, bought and run."), x, y, width, HL_REPORT_BODY, FALSE);
  cairo_set_line_width (report->cr, 1.6);
  cairo_set_dash (report->cr, NULL, 0, 0.0);
  cairo_rectangle (report->cr, report->left, report->y, report->right - report->left, y + BOX_PADDING - report->y);
  cairo_stroke (report->cr);
  report->y = y + BOX_PADDING;
}

static void
cover_results (HlReport *report)
{
  static const char *const keys[] = { "net_power", "gross_power", "heat_delivered", "heat_input", "fuel_heat_lhv", "cycle_efficiency",
                                      "net_efficiency_lhv", "utilisation" };
  g_autoptr (HlSummary) summary = hl_summary_new (report->solution);
  g_autofree char *how = hl_solution_summary (report->solution);
  hl_report_pair (report, _("State"), how);
  for (guint i = 0; i < G_N_ELEMENTS (keys); i++)
    {
      const HlSummaryLine *line = hl_summary_find (summary, keys[i]);
      g_autofree char *value = line != NULL ? hl_summary_text (line, units (report)) : NULL;
      g_autofree char *words = line != NULL && *line->basis != '\0' ? g_strdup_printf ("%s  ·  %s", value, line->basis) : g_strdup (value);
      if (line != NULL)
        hl_report_pair (report, line->name, words);
    }
}

static void
write_cover (HlReport *report)
{
  const HlSheetFields *f = report->fields;
  const struct { const char *name, *value; } fields[] = {
    { _("Variant"), f->variant }, { _("Case"), f->case_name }, { _("Date"), f->date }, { _("Revision"), f->revision },
    { _("Drawn"), f->drawn }, { _("Checked"), f->checked }, { _("Approved"), f->approved },
  };
  hl_report_bare_page (report, report->page_width, report->page_height);
  report->y = 0.17 * report->height;
  hl_set_colour (report->cr, &report->theme.accent);
  cairo_rectangle (report->cr, report->left, report->y - 22.0, 64.0, 5.0);
  cairo_fill (report->cr);
  hl_set_colour (report->cr, &report->theme.ink);
  report->y += hl_text_show_wrapped (report->cr, &report->theme, plant_title (report), report->left, report->y, report->right - report->left, COVER_TITLE, TRUE) + 10.0;
  hl_set_colour (report->cr, &report->theme.quiet);
  report->y += hl_text_show_wrapped (report->cr, &report->theme, _("Heat balance report"), report->left, report->y, report->right - report->left,
                                     COVER_SUBTITLE, FALSE) + 40.0;
  cover_results (report);
  hl_report_gap (report, 22.0);
  for (guint i = 0; i < G_N_ELEMENTS (fields); i++)
    hl_report_pair (report, fields[i].name, fields[i].value != NULL && *fields[i].value != '\0' ? fields[i].value : "–");
  report->y = MAX (report->y + 20.0, report->height - 68.0 * HL_MILLIMETRE);
  caution_box (report);
  hl_set_colour (report->cr, &report->theme.quiet);
  hl_text_show_within (report->cr, &report->theme, "Heatloom " HL_VERSION, report->right, report->height - 12.0 * HL_MILLIMETRE, 300.0, 1, HL_REPORT_SMALL, FALSE);
}

/* One line of the contents, with dots between title and page; a click leads there. */
static void
contents_line (HlReport *report, guint n)
{
  const HlReportSection *section = &g_array_index (report->contents, HlReportSection, n);
  g_autofree char *link = g_strdup_printf ("dest='section%u'", n), *page = g_strdup_printf ("%d", section->page);
  double y = report->y + HL_REPORT_BODY, from, to;
  static const double dots[] = { 1.0, 4.0 };
  cairo_tag_begin (report->cr, CAIRO_TAG_LINK, link);
  hl_set_colour (report->cr, &report->theme.ink);
  hl_text_show_within (report->cr, &report->theme, section->title, report->left, y, report->right - report->left - 60.0, -1, HL_REPORT_BODY, FALSE);
  hl_text_show (report->cr, &report->theme, page, report->right, y, 1, HL_REPORT_BODY, FALSE);
  cairo_tag_end (report->cr, CAIRO_TAG_LINK);
  from = report->left + hl_text_width (&report->theme, section->title, HL_REPORT_BODY, FALSE) + 10.0;
  to = report->right - hl_text_width (&report->theme, page, HL_REPORT_BODY, FALSE) - 10.0;
  hl_set_colour (report->cr, &report->theme.quiet);
  cairo_set_dash (report->cr, dots, 2, 0.0);
  cairo_set_line_width (report->cr, 1.0);
  if (to > from)
    {
      cairo_move_to (report->cr, from, y - 1.0);
      cairo_line_to (report->cr, to, y - 1.0);
      cairo_stroke (report->cr);
    }
  report->y += 2.0 * HL_REPORT_BODY;
}

static void
write_contents (HlReport *report)
{
  hl_report_page (report, FALSE);
  hl_set_colour (report->cr, &report->theme.accent);
  hl_text_show (report->cr, &report->theme, _("Contents"), report->left, report->y + HL_REPORT_HEAD, -1, HL_REPORT_HEAD, TRUE);
  report->y += 2.2 * HL_REPORT_HEAD;
  for (guint n = 0; report->contents != NULL && n < report->contents->len; n++)
    contents_line (report, n);
}

static void
write_site (HlReport *report)
{
  const HlSite *site = hl_plant_site (report->plant);
  g_autofree char *altitude = hl_units_format (site->altitude, HL_DIMENSION_LENGTH, units (report));
  g_autofree char *pressure = hl_units_format (hl_plant_site_pressure (report->plant), HL_DIMENSION_PRESSURE, units (report));
  g_autofree char *ambient = hl_units_format (site->ambient_T, HL_DIMENSION_TEMPERATURE, units (report));
  g_autofree char *wet_bulb = hl_units_format (site->wet_bulb_T, HL_DIMENSION_TEMPERATURE, units (report));
  g_autofree char *water = g_strdup_printf (_("%s; pressures are absolute"), hl_plant_formulation_name (report->plant));
  g_autofree char *size = g_strdup_printf (_("%u components, %u streams"), hl_plant_n_components (report->plant), hl_plant_n_streams (report->plant));
  g_autofree char *height = g_strdup_printf (_("%s, air pressure %s (ISO 2533)"), altitude, pressure);
  hl_report_pair (report, _("Plant"), plant_title (report));
  hl_report_pair (report, _("Extent"), size);
  hl_report_pair (report, _("Properties of water"), water);
  hl_report_pair (report, _("Altitude of the site"), height);
  hl_report_pair (report, _("Ambient temperature"), ambient);
  hl_report_pair (report, _("Wet bulb temperature"), wet_bulb);
}

/* The rows of a table whose origin is not that of column @column. */
static HlTable *
without (const HlTable *table, guint column, const char *text)
{
  g_autoptr (GArray) rows = g_array_new (FALSE, FALSE, sizeof (guint));
  HlTable *kept;
  for (guint row = 0; row < table->n_rows; row++)
    if (!g_str_equal (hl_table_cell (table, row, column)->text, text))
      g_array_append_val (rows, row);
  kept = hl_table_pick (table, (const guint *) (const void *) rows->data, rows->len);
  return kept;
}

static void
write_basis (HlReport *report)
{
  g_autoptr (HlTable) values = hl_table_values (report->solution, units (report), FALSE);
  g_autoptr (HlTable) given = without (values, 3, hl_origin_name (HL_ORIGIN_ASSUMED));
  hl_report_page (report, FALSE);
  hl_report_section (report, _("Basis of design"));
  write_site (report);
  hl_report_heading (report, _("Values given or tied"));
  if (given->n_rows == 0)
    hl_report_paragraph (report, _("None: the plant rests on assumed values alone."), HL_REPORT_BODY, FALSE, FALSE);
  else
    hl_report_table (report, given, NULL, (const int[]) { 0, 1, 2, 4, -1 }, HL_REPORT_SMALL, NULL);
}

static void
write_drawing (HlReport *report)
{
  g_autofree char *numbered = g_strdup_printf ("%u  %s", report->sections->len + 1, _("Heat balance drawing"));
  double width, height;
  hl_paper_size (report->paper, &width, &height);
  hl_report_bare_page (report, width, height);
  hl_report_mark (report, numbered, FALSE);
  if (!report->is_counting)
    hl_draw_paper_sheet (report->cr, &report->theme, report->plant, report->solution, report->paper, report->fields, 0.0);
}

static void
write_diagram (HlReport *report, HlStateDiagramKind kind)
{
  double width, height;
  hl_report_page (report, TRUE);
  hl_report_section (report, hl_state_diagram_title (kind));
  width = report->right - report->left;
  height = MIN (report->bottom - report->y, DIAGRAM_SHARE * width);
  if (!report->is_counting)
    {
      g_autoptr (HlStateDiagram) diagram = hl_state_diagram_new_of_kind (report->solution, kind, units (report), width, height);
      cairo_save (report->cr);
      cairo_translate (report->cr, report->left, report->y);
      hl_state_diagram_draw (diagram, report->cr, &report->theme, !hl_solution_is_solved (report->solution), -1);
      cairo_restore (report->cr);
    }
}

static void
write_streams (HlReport *report)
{
  g_autoptr (HlTable) streams = hl_table_streams (report->solution, units (report));
  hl_report_page (report, TRUE);
  hl_report_section (report, _("Streams"));
  hl_report_table (report, streams, NULL, (const int[]) { 0, 1, 2, 4, 5, 6, 7, 8, 9, 10, 11, 12, 13, 14, -1 }, HL_REPORT_SMALL - 0.6, NULL);
}

static void
write_performance (HlReport *report)
{
  g_autoptr (HlTable) summary = hl_table_summary (report->solution, units (report));
  hl_report_page (report, FALSE);
  hl_report_section (report, _("Performance"));
  if (summary->n_rows == 0)
    hl_report_paragraph (report, _("The plant is not solved: it has no performance. The findings say what is missing or contradictory."), HL_REPORT_BODY, FALSE, FALSE);
  else
    hl_report_table (report, summary, NULL, (const int[]) { 0, 1, 2, 3, 4, -1 }, HL_REPORT_SMALL, NULL);
}

/* So many side by side, with the reference; further ones follow in a table of their own. */
#define VARIANTS_A_TABLE 6

static void
write_variants (HlReport *report)
{
  const HlComparison *comparison = report->fields->comparison;
  g_autoptr (HlTable) all = NULL, table = NULL;
  g_autofree guint *rows = NULL;
  g_autofree char *from = NULL;
  guint n, n_rows, reference;
  if (comparison == NULL)
    return;
  all = hl_table_variants (comparison);
  n = hl_comparison_n_columns (comparison);
  n_rows = hl_comparison_n_rows (comparison);
  reference = hl_comparison_reference (comparison);
  rows = g_new (guint, n_rows + 1);
  for (guint i = 0; i < n_rows; i++)
    rows[i] = i;
  table = hl_table_pick (all, rows, n_rows);
  hl_report_page (report, TRUE);
  hl_report_section (report, _("Variants"));
  from = g_strdup_printf (_("What each variant changes, and what comes of it. The first column of numbers is “%s”."), hl_comparison_name (comparison, reference));
  hl_report_paragraph (report, from, HL_REPORT_BODY, FALSE, FALSE);
  for (guint first = 0; first < n;)
    {
      int columns[4 + VARIANTS_A_TABLE], k = 0;
      columns[k++] = 0;
      columns[k++] = 1;
      columns[k++] = 2;
      columns[k++] = 3 + (int) reference;
      for (; first < n && k < 3 + VARIANTS_A_TABLE; first++)
        if (first != reference)
          columns[k++] = 3 + (int) first;
      columns[k] = -1;
      hl_report_table (report, table, NULL, columns, HL_REPORT_SMALL, NULL);
    }
  for (guint i = 0; i < hl_comparison_n_notes (comparison); i++)
    hl_report_paragraph (report, hl_comparison_note (comparison, i), HL_REPORT_SMALL, FALSE, FALSE);
}

/* Component by component, a table each. */
static void
write_equipment (HlReport *report)
{
  g_autoptr (HlTable) all = hl_table_components (report->solution, units (report));
  hl_report_page (report, FALSE);
  hl_report_section (report, _("Equipment"));
  hl_report_columns (report, TRUE);
  for (guint row = 0; row < all->n_rows;)
    {
      g_autoptr (GArray) rows = g_array_new (FALSE, FALSE, sizeof (guint));
      g_autoptr (HlTable) own = NULL;
      g_autofree char *heading = NULL;
      const char *id = hl_table_cell (all, row, 0)->text, *name = hl_table_cell (all, row, 1)->text, *kind = hl_table_cell (all, row, 2)->text;
      heading = g_str_equal (name, kind) ? g_strdup_printf ("%s  %s", id, name) : g_strdup_printf ("%s  %s (%s)", id, name, kind);
      for (; row < all->n_rows && g_str_equal (hl_table_cell (all, row, 0)->text, id); row++)
        /* The second law has a section of its own. */
        if (strstr (hl_table_cell (all, row, 7)->text, ".exergy_") == NULL)
          g_array_append_val (rows, row);
      own = hl_table_pick (all, (const guint *) (const void *) rows->data, rows->len);
      /* A short table is not torn apart. */
      hl_report_room (report, MIN (rows->len, 14) * 1.8 * HL_REPORT_SMALL + 5.0 * HL_REPORT_BODY);
      hl_report_heading (report, heading);
      hl_report_table (report, own, all, (const int[]) { 3, 4, 5, 6, -1 }, HL_REPORT_SMALL - 0.6, NULL);
    }
  hl_report_columns (report, FALSE);
}

static void
write_findings (HlReport *report)
{
  g_autoptr (HlTable) findings = hl_table_findings (report->solution);
  hl_report_section (report, _("Findings"));
  if (findings->n_rows == 0)
    hl_report_paragraph (report, _("Nothing is missing, contradictory or against good practice."), HL_REPORT_BODY, FALSE, FALSE);
  else
    hl_report_table (report, findings, NULL, (const int[]) { 0, 1, 2, 3, -1 }, HL_REPORT_SMALL, NULL);
}

static void
write_assumed (HlReport *report)
{
  g_autoptr (HlTable) assumed = hl_table_values (report->solution, units (report), TRUE);
  hl_report_section (report, _("Assumed values to confirm"));
  if (assumed->n_rows == 0)
    {
      hl_report_paragraph (report, _("None: every value was given by the engineer."), HL_REPORT_BODY, FALSE, FALSE);
      return;
    }
  hl_report_paragraph (report, _("These are usual values that nobody has confirmed for this plant yet. Each of them may change the results."), HL_REPORT_BODY, FALSE, FALSE);
  hl_report_table (report, assumed, NULL, (const int[]) { 0, 1, 2, 4, -1 }, HL_REPORT_SMALL, _("Confirmed"));
}

static void
explain (HlReport *report, const HlAddress *address, const char *name)
{
  g_autofree char *text = hl_solution_explain (report->solution, address);
  guint n_lines = 1;
  if (text == NULL || *g_strchomp (text) == '\0')
    return;
  for (const char *c = text; *c != '\0'; c++)
    n_lines += *c == '\n';
  hl_report_room (report, (MIN (n_lines, 16) + 1) * 1.3 * HL_REPORT_SMALL + 3.0 * HL_REPORT_BODY);
  hl_report_heading (report, name);
  hl_report_paragraph (report, text, HL_REPORT_SMALL + 0.4, FALSE, FALSE);
}

static void
write_origins (HlReport *report)
{
  const HlPlant *plant = report->plant;
  hl_report_section (report, _("How the results came about"));
  if (!hl_solution_is_solved (report->solution))
    {
      hl_report_paragraph (report, _("The plant is not solved."), HL_REPORT_BODY, FALSE, FALSE);
      return;
    }
  for (guint n = 0; n < hl_solution_n_results (report->solution); n++)
    {
      double value;
      const HlQuantityKind *kind = hl_solution_result (report->solution, n, &value);
      HlAddress address = hl_address_plant (kind->key);
      explain (report, &address, _(kind->name));
    }
  for (guint i = 0; i < hl_plant_n_components (plant); i++)
    {
      const HlComponent *component = hl_plant_component (plant, i);
      /* What an engineer asks a component for first. */
      static const char *const keys[] = { "internal_power", "power", "heat", "terminal_difference" };
      for (guint k = 0; k < G_N_ELEMENTS (keys); k++)
        {
          HlAddress address = hl_address_component (component->id, keys[k]);
          g_autofree char *words = NULL;
          if (hl_component_quantity_kind (component, keys[k]) == NULL || hl_plant_value_wherever (plant, &address, NULL) != NULL)
            continue;
          words = hl_plant_describe (plant, &address);
          explain (report, &address, words);
        }
    }
}

static void
write_checks (HlReport *report)
{
  HlSolveEffort effort;
  double mass, energy;
  g_autofree char *balances = NULL, *size = NULL;
  hl_report_section (report, _("Checks of the calculation"));
  hl_solution_balances (report->solution, &mass, &energy);
  hl_solution_effort (report->solution, &effort);
  balances = g_strdup_printf (_("%.1e of mass, %.1e of energy, relative to the largest term"), fabs (mass), fabs (energy));
  size = g_strdup_printf (_("%u unknowns in %u blocks, the largest of %u"), effort.n_unknowns, effort.n_blocks, effort.largest_block);
  hl_report_pair (report, _("Balances of the plant"), balances);
  hl_report_pair (report, _("Equations"), size);
  hl_report_pair (report, _("Method"), _("All equations are solved together by damped Newton steps with exact derivatives, after their structure has been checked for "
                                          "values missing or surplus. Totals come from unrounded values."));
}

void
hl_report_write (HlReport *report)
{
  write_cover (report);
  write_contents (report);
  write_basis (report);
  write_drawing (report);
  write_diagram (report, HL_STATE_DIAGRAM_TS);
  write_diagram (report, HL_STATE_DIAGRAM_HS);
  write_streams (report);
  write_performance (report);
  write_variants (report);
  write_equipment (report);
  hl_report_exchangers (report);
  hl_report_exergy (report);
  write_findings (report);
  write_assumed (report);
  write_origins (report);
  write_checks (report);
}
