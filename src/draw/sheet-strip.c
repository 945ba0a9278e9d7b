/* What stands below the drawing on a sheet: legends, performance, title block.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "draw/sheet-private.h"
#include <math.h>
#include "draw/free-space.h"
#include "draw/tables.h"
#include "draw/text.h"
#include "plant/circuit.h"
#include "plant/i18n.h"

#define THIN_LINE   0.8
#define THICK_LINE  1.4
#define LINE        1.52     /* of the text size: from line to line */
#define SMALL       0.80     /* of the text size: names of fields */
#define PADDING     0.7      /* of the text size */

static void
line (cairo_t *cr, const HlStrip *strip, double x1, double y1, double x2, double y2, double width)
{
  hl_set_colour (cr, &strip->theme->ink);
  cairo_set_dash (cr, NULL, 0, 0.0);
  cairo_set_line_width (cr, width);
  cairo_move_to (cr, x1, y1);
  cairo_line_to (cr, x2, y2);
  cairo_stroke (cr);
}

static double
heading (cairo_t *cr, const HlStrip *strip, const char *words, const HlBox *box)
{
  double y = box->y + 1.5 * strip->text;
  hl_set_colour (cr, &strip->theme->ink);
  hl_text_show_within (cr, strip->theme, words, box->x + PADDING * strip->text, y, box->width - 2.0 * PADDING * strip->text, -1, strip->text, TRUE);
  return y + LINE * strip->text;
}

/* A label as the drawing has them, with the names of its figures in their places. */
static double
label_legend (cairo_t *cr, const HlStrip *strip, double x, double y, double width)
{
  HlUnitSet units = hl_plant_units (strip->plant);
  g_autofree char *flow = g_strdup_printf (_("flow [%s]"), hl_units_label (HL_DIMENSION_MASS_FLOW, units));
  g_autofree char *state = g_strdup_printf (_("pressure abs. [%s] · temp. [%s], wet: x"), hl_units_label (HL_DIMENSION_PRESSURE, units),
                                            hl_units_label (HL_DIMENSION_TEMPERATURE, units));
  g_autoptr (HlStream) stream = hl_stream_new ("n", "", "", "", "");
  HlStreamPlace place = { .look = HL_LOOK_STEAM, .label = { 0.0, 0.0, 0.0, HL_LABEL_HEIGHT }, .label_lines = { flow, state } };
  double scale;
  place.label.width = HL_LABEL_TEXT_LEFT + HL_LABEL_TEXT_RIGHT + MAX (hl_text_width (strip->theme, flow, HL_LABEL_FLOW_SIZE, TRUE),
                                                                       hl_text_width (strip->theme, state, HL_LABEL_STATE_SIZE, FALSE));
  scale = MIN (width / place.label.width, strip->text / 10.0);
  cairo_save (cr);
  cairo_translate (cr, x, y);
  cairo_scale (cr, scale, scale);
  hl_draw_stream_label (cr, strip->theme, &place, stream, NULL, FALSE, FALSE);
  cairo_restore (cr);
  return y + HL_LABEL_HEIGHT * scale;
}

/* Where the next line of the legend goes. */
static double
media_legend (cairo_t *cr, const HlStrip *strip, double x, double y, double width)
{
  gboolean is_there[HL_N_LOOKS] = { FALSE };
  double sample = 3.2 * strip->text, column = width / 2.0, size = strip->text;
  guint n = 0;
  for (guint i = 0; i < hl_plant_n_streams (strip->plant); i++)
    is_there[hl_layout_stream (strip->layout, i)->look] = TRUE;
  for (int look = 0; look <= HL_N_LOOKS; look++)
    {
      gboolean is_shaft = look == HL_N_LOOKS;
      double left = x + (n % 2) * column, at = y + (n / 2) * LINE * size;
      const HlPoint shaft[2] = { { left, at - 0.35 * size }, { left + sample, at - 0.35 * size } };
      if (is_shaft ? hl_layout_n_shafts (strip->layout) == 0 : !is_there[look])
        continue;
      if (is_shaft)
        hl_draw_shaft_line (cr, strip->theme, shaft, 2);
      else
        {
          hl_set_look_pen (cr, strip->theme, look, FALSE);
          cairo_move_to (cr, shaft[0].x, shaft[0].y);
          cairo_line_to (cr, shaft[1].x, shaft[1].y);
          cairo_stroke (cr);
        }
      hl_set_colour (cr, &strip->theme->ink);
      hl_text_show_within (cr, strip->theme, is_shaft ? _("shaft") : hl_look_name (look), left + sample + 0.6 * size, at,
                           column - sample - 1.0 * size, -1, 0.92 * size, FALSE);
      n++;
    }
  return y + ((n + 1) / 2) * LINE * size;
}

static void
draw_legend (cairo_t *cr, const HlStrip *strip, const HlBox *box)
{
  double padding = PADDING * strip->text, y = heading (cr, strip, _("Legend"), box);
  y = label_legend (cr, strip, box->x + padding, y - strip->text, box->width - 2.0 * padding);
  y = media_legend (cr, strip, box->x + padding, y + 1.9 * strip->text, box->width - 2.0 * padding);
  hl_set_colour (cr, &strip->theme->quiet);
  hl_text_show_wrapped (cr, strip->theme,
                        _("n: number of the stream · x: quality · η: efficiency · TTD, DCA: terminal difference, drain approach · Δp: pressure loss"),
                        box->x + padding, y - 0.7 * strip->text, box->width - 2.0 * padding, SMALL * strip->text, FALSE);
}

/* What a reader of the sheet asks for, in the order of the table. */
static const char *const sheet_lines[] = {
  "gross_power", "own_consumption", "net_power", "heat_input", "fuel_heat_lhv", "heat_delivered", "cooling_duty",
  "cycle_efficiency", "net_efficiency_lhv", "net_efficiency_hhv", "utilisation",
  "turbine_heat_rate_gross", "plant_heat_rate_net_lhv", "steam_rate", "live_steam", "make_up",
};

static char *
short_name (const HlSummaryLine *line)
{
  if (g_str_has_suffix (line->key, "_lhv"))
    return g_strdup_printf (_("%s, LHV"), line->name);
  if (g_str_has_suffix (line->key, "_hhv"))
    return g_strdup_printf (_("%s, HHV"), line->name);
  return g_strdup (line->name);
}

static void
draw_performance (cairo_t *cr, const HlStrip *strip, const HlBox *box)
{
  g_autoptr (HlSummary) summary = strip->solution != NULL ? hl_summary_new (strip->solution) : NULL;
  double padding = PADDING * strip->text, top = heading (cr, strip, _("Performance"), box), column = box->width / 2.0;
  gboolean has_fuel = summary != NULL && hl_summary_find (summary, "fuel_heat_lhv") != NULL;
  guint n_shown = 0, n = 0, n_rows;
  if (summary == NULL || hl_summary_n_lines (summary) == 0)
    {
      hl_set_colour (cr, &strip->theme->warning);
      hl_text_show_within (cr, strip->theme, strip->solution != NULL ? _("Not solved: figures shown are incomplete") : _("Drawing without figures"),
                           box->x + padding, top, box->width - 2.0 * padding, -1, strip->text, TRUE);
      return;
    }
  for (guint i = 0; i < G_N_ELEMENTS (sheet_lines); i++)
    n_shown += hl_summary_find (summary, sheet_lines[i]) != NULL;
  n_rows = (n_shown + 1) / 2;
  for (guint i = 0; i < G_N_ELEMENTS (sheet_lines); i++)
    {
      const HlSummaryLine *figure = hl_summary_find (summary, sheet_lines[i]);
      double x = box->x + padding + (n / n_rows) * column, y = top + (n % n_rows) * LINE * strip->text, room;
      g_autofree char *name = NULL, *text = NULL;
      if (figure == NULL)
        continue;
      name = has_fuel ? short_name (figure) : g_strdup (figure->name);
      text = hl_summary_text (figure, hl_plant_units (strip->plant));
      room = column - 2.0 * padding;
      hl_set_colour (cr, &strip->theme->ink);
      hl_text_show (cr, strip->theme, text, x + room, y, 1, 0.96 * strip->text, g_str_equal (figure->key, "net_power"));
      room -= hl_text_width (strip->theme, text, strip->text, FALSE) + strip->text;
      hl_text_show_within (cr, strip->theme, name, x, y, room, -1, 0.96 * strip->text, g_str_equal (figure->key, "net_power"));
      n++;
    }
}

/* A field of the title block: its name small above, its content below. */
static void
field (cairo_t *cr, const HlStrip *strip, const char *name, const char *content, double x, double y, double width, double height)
{
  double padding = 0.5 * strip->text;
  line (cr, strip, x, y, x + width, y, THIN_LINE);
  line (cr, strip, x, y, x, y + height, THIN_LINE);
  hl_set_colour (cr, &strip->theme->quiet);
  hl_text_show_within (cr, strip->theme, name, x + padding, y + 1.05 * strip->text, width - 2.0 * padding, -1, SMALL * strip->text, FALSE);
  hl_set_colour (cr, &strip->theme->ink);
  if (content != NULL && *content != '\0')
    hl_text_show_within (cr, strip->theme, content, x + padding, y + height - 0.6 * strip->text, width - 2.0 * padding, -1, strip->text, FALSE);
}

static char *
units_words (HlUnitSet units)
{
  return g_strdup_printf ("%s, %s, %s, %s", hl_units_label (HL_DIMENSION_PRESSURE, units), hl_units_label (HL_DIMENSION_TEMPERATURE, units),
                          hl_units_label (HL_DIMENSION_MASS_FLOW, units), hl_units_label (HL_DIMENSION_ENTHALPY, units));
}

static void
draw_title_block (cairo_t *cr, const HlStrip *strip, const HlBox *box)
{
  const HlSheetFields *f = strip->fields;
  HlUnitSet units = hl_plant_units (strip->plant);
  double size = strip->text, head = 3.3 * size, row = 2.85 * size, foot = box->height - head - 3.0 * row;
  double y = box->y + head, third = box->width / 3.0, fifth = box->width / 5.0, padding = PADDING * size, used;
  const char *title = hl_plant_title (strip->plant);
  g_autofree char *units_text = units_words (units);
  g_autofree char *ambient = hl_units_format (hl_plant_site (strip->plant)->ambient_T, HL_DIMENSION_TEMPERATURE, units);
  g_autofree char *water = g_strdup_printf (_("%s, ambient %s"), hl_plant_formulation_name (strip->plant), ambient);
  g_autofree char *open = g_strdup_printf ("%u", hl_plant_n_assumed (strip->plant));
  g_autofree char *findings = strip->solution != NULL ? g_strdup_printf ("%u", hl_solution_n_findings (strip->solution)) : NULL;
  g_autofree char *sheet = g_strdup_printf ("%s · %.2f", strip->paper, strip->scale);
  hl_set_colour (cr, &strip->theme->ink);
  hl_text_show_within (cr, strip->theme, title != NULL && *title != '\0' ? title : _("Plant without a title"), box->x + padding, box->y + 1.75 * size,
                       box->width - 2.0 * padding, -1, 1.45 * size, TRUE);
  hl_text_show_within (cr, strip->theme, _("Heat balance drawing"), box->x + padding, box->y + 2.95 * size, box->width - 2.0 * padding, -1, 0.95 * size, FALSE);
  field (cr, strip, _("Variant"), f->variant, box->x, y, 0.3 * box->width, row);
  field (cr, strip, _("Case"), f->case_name, box->x + 0.3 * box->width, y, 0.3 * box->width, row);
  field (cr, strip, _("Assumed values open"), open, box->x + 0.6 * box->width, y, 0.24 * box->width, row);
  field (cr, strip, _("Findings"), findings, box->x + 0.84 * box->width, y, 0.16 * box->width, row);
  y += row;
  field (cr, strip, _("Units"), units_text, box->x, y, third, row);
  field (cr, strip, _("Properties of water, site"), water, box->x + third, y, third, row);
  field (cr, strip, _("Paper, scale of drawing"), sheet, box->x + 2.0 * third, y, third, row);
  y += row;
  field (cr, strip, _("Date"), f->date, box->x, y, fifth, row);
  field (cr, strip, _("Revision"), f->revision, box->x + fifth, y, fifth, row);
  field (cr, strip, _("Drawn"), f->drawn, box->x + 2.0 * fifth, y, fifth, row);
  field (cr, strip, _("Checked"), f->checked, box->x + 3.0 * fifth, y, fifth, row);
  field (cr, strip, _("Approved"), f->approved, box->x + 4.0 * fifth, y, fifth, row);
  y += row;
  line (cr, strip, box->x, y, box->x + box->width, y, THIN_LINE);
  hl_set_colour (cr, &strip->theme->ink);
  used = hl_text_show_wrapped (cr, strip->theme, _("Concept figures only: not for construction, operation or purchase; local codes and licensed practice decide."),
                               box->x + padding, y + 0.35 * size, box->width - 2.0 * padding, SMALL * size, TRUE);
  hl_set_colour (cr, &strip->theme->quiet);
  hl_text_show_within (cr, strip->theme, "Heatloom " HL_VERSION, box->x + box->width - padding, y + MAX (foot - 0.45 * size, used + size), box->width / 2.0, 1,
                       SMALL * size, FALSE);
}

void
hl_draw_strip (cairo_t *cr, const HlStrip *strip, const HlBox *box)
{
  HlBox legend = *box, performance = *box, title = *box;
  legend.width = 0.245 * box->width;
  performance.x = legend.x + legend.width;
  performance.width = 0.355 * box->width;
  title.x = performance.x + performance.width;
  title.width = box->x + box->width - title.x;
  hl_set_colour (cr, &strip->theme->ground);
  cairo_rectangle (cr, box->x, box->y, box->width, box->height);
  cairo_fill (cr);
  draw_legend (cr, strip, &legend);
  draw_performance (cr, strip, &performance);
  draw_title_block (cr, strip, &title);
  line (cr, strip, box->x, box->y, box->x + box->width, box->y, THICK_LINE);
  line (cr, strip, box->x, box->y, box->x, box->y + box->height, THICK_LINE);
  line (cr, strip, performance.x, box->y, performance.x, box->y + box->height, THICK_LINE);
  line (cr, strip, title.x, box->y, title.x, box->y + box->height, THICK_LINE);
}
