/* What a state diagram may show beside the cycle: areas of heat, temperatures of sources and sinks, a table of the states.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "draw/state-diagram-private.h"
#include <math.h>
#include <string.h>
#include "draw/text.h"
#include "plant/i18n.h"

static const struct { const char *id, *name; } extras[HL_N_DIAGRAM_EXTRAS] = {
  { "areas", N_("Areas of heat added and rejected") },
  { "sources", N_("Temperatures of heat sources and sinks") },
  { "table", N_("Table of the states") },
  { "isobars", N_("Isobars at round pressures") },
};

const char *
hl_diagram_extra_id (guint n)
{
  return n < HL_N_DIAGRAM_EXTRAS ? extras[n].id : NULL;
}

const char *
hl_diagram_extra_name (guint n)
{
  return n < HL_N_DIAGRAM_EXTRAS ? _(extras[n].name) : NULL;
}

gboolean
hl_diagram_extras_parse (const char *text, guint *flags)
{
  g_auto (GStrv) words = g_strsplit (text, ",", -1);
  *flags = 0;
  for (guint k = 0; words[k] != NULL; k++)
    {
      guint n = 0;
      while (n < HL_N_DIAGRAM_EXTRAS && !g_str_equal (extras[n].id, g_strstrip (words[k])))
        n++;
      if (n == HL_N_DIAGRAM_EXTRAS)
        return FALSE;
      *flags |= 1u << n;
    }
  return TRUE;
}

/* --- which processes exchange heat with something else than the cycle -------------------- */

static gboolean
gives_and_takes (const HlCycle *cycle, guint component)
{
  gboolean gives = FALSE, takes = FALSE;
  for (guint i = 0; i < cycle->processes->len; i++)
    {
      const HlProcess *process = &g_array_index (cycle->processes, HlProcess, i);
      if (process->component != component)
        continue;
      gives |= process->kind == HL_PROCESS_COOLING;
      takes |= process->kind == HL_PROCESS_HEATING;
    }
  return gives && takes;
}

/* 1 where heat is added from outside, -1 where it is rejected or delivered, 0 for all else. */
static int
heat_of (const HlCycle *cycle, const HlProcess *process)
{
  if ((process->kind != HL_PROCESS_HEATING && process->kind != HL_PROCESS_COOLING) || gives_and_takes (cycle, process->component))
    return 0;
  return process->kind == HL_PROCESS_HEATING ? 1 : -1;
}

/* Temperature of the other side along a process, over its entropy. */
static void
add_other_side (HlCycle *cycle, const HlSolution *solution, const HlProcess *process)
{
  g_autoptr (HlHeatCurve) curve = hl_heat_curve_new (solution, (int) process->component);
  gboolean is_heated = process->kind == HL_PROCESS_HEATING;
  const GArray *other = curve == NULL ? NULL : is_heated ? curve->hot : curve->cold;
  if (other == NULL || other->len < 2)
    return;
  HlPlotSeries *series = hl_plot_series_new (is_heated ? HL_PLOT_GAS : HL_PLOT_COOLING, HL_PLOT_DASHED, 1.6);
  const HlState *cold_end = is_heated ? &process->from : &process->to, *hot_end = is_heated ? &process->to : &process->from;
  for (int k = 0; k <= 48; k++)
    {
      double h = cold_end->h + k / 48.0 * (hot_end->h - cold_end->h), p = cold_end->p + k / 48.0 * (hot_end->p - cold_end->p);
      double T = hl_heat_curve_at (other, process->m * (h - cold_end->h));
      HlState st;
      if (isfinite (T) && hl_fluid_state_ph (process->fluid, p, h, &st) == HL_OK)
        hl_plot_series_add (series, st.s, T);
    }
  if (hl_plot_series_n (series) > 1)
    g_ptr_array_add (cycle->sources, series);
  else
    hl_plot_series_free (series);
}

void
hl_cycle_add_sources (HlCycle *cycle, const HlSolution *solution)
{
  if (cycle->kind != HL_STATE_DIAGRAM_TS || !(cycle->extras & HL_DIAGRAM_SOURCES))
    return;
  for (guint i = 0; i < cycle->processes->len; i++)
    {
      const HlProcess *process = &g_array_index (cycle->processes, HlProcess, i);
      if (heat_of (cycle, process) != 0 && process->m > 0.0)
        add_other_side (cycle, solution, process);
    }
}

/* --- areas -------------------------------------------------------------------------------- */

void
hl_state_diagram_add_areas (HlStateDiagram *diagram, const HlCycle *cycle)
{
  if (diagram->kind != HL_STATE_DIAGRAM_TS || !(cycle->extras & HL_DIAGRAM_AREAS))
    return;
  for (guint i = 0; i < cycle->processes->len; i++)
    {
      const HlProcess *process = &g_array_index (cycle->processes, HlProcess, i);
      int heat = heat_of (cycle, process);
      if (heat == 0)
        continue;
      g_autoptr (GArray) path = hl_process_path (process, diagram->kind, &diagram->x_axis, &diagram->y_axis);
      HlPlotSeries *area = hl_plot_series_new (heat > 0 ? HL_PLOT_STEAM : HL_PLOT_COOLING, HL_PLOT_SOLID, 0.0);
      for (guint k = 0; k < path->len; k++)
        hl_plot_series_add (area, g_array_index (path, HlPathPoint, k).s, g_array_index (path, HlPathPoint, k).T);
      g_ptr_array_add (diagram->areas, area);
    }
}

void
hl_state_diagram_draw_areas (const HlStateDiagram *diagram, cairo_t *cr, const HlTheme *theme, gboolean is_stale)
{
  double bottom = diagram->frame.y + diagram->frame.height;
  for (guint i = 0; i < diagram->areas->len; i++)
    {
      const HlPlotSeries *area = diagram->areas->pdata[i];
      const HlColour *colour = hl_plot_colour (theme, area->colour, is_stale);
      guint n = hl_plot_series_n (area);
      if (n < 2)
        continue;
      cairo_save (cr);
      cairo_rectangle (cr, diagram->frame.x, diagram->frame.y, diagram->frame.width, diagram->frame.height);
      cairo_clip (cr);
      cairo_new_path (cr);
      for (guint k = 0; k < n; k++)
        cairo_line_to (cr, hl_plot_axis_to_pixel (&diagram->x_axis, hl_plot_series_point (area, k)->x),
                       hl_plot_axis_to_pixel (&diagram->y_axis, hl_plot_series_point (area, k)->y));
      cairo_line_to (cr, hl_plot_axis_to_pixel (&diagram->x_axis, hl_plot_series_point (area, n - 1)->x), bottom);
      cairo_line_to (cr, hl_plot_axis_to_pixel (&diagram->x_axis, hl_plot_series_point (area, 0)->x), bottom);
      cairo_close_path (cr);
      cairo_set_source_rgba (cr, colour->r, colour->g, colour->b, 0.14);
      cairo_fill (cr);
      cairo_restore (cr);
    }
}

/* --- the table of states -------------------------------------------------------------------- */

enum { ID, P, T_OR_X, H, S, N_COLUMNS };

static char *
cell_text (const HlCycle *cycle, const HlCyclePoint *point, guint column)
{
  const HlState *state = &point->state;
  switch (column)
    {
    case ID: return g_strdup (point->id);
    case P: return hl_units_format_number (state->p, HL_DIMENSION_PRESSURE, cycle->units);
    case T_OR_X:
      if (state->phase == HL_PHASE_TWO_PHASE)
        {
          g_autofree char *x = hl_units_format_number (state->x, HL_DIMENSION_RATIO, cycle->units);
          return g_strdup_printf ("x %s", x);
        }
      return hl_units_format_number (state->T, HL_DIMENSION_TEMPERATURE, cycle->units);
    case H: return hl_units_format_number (state->h, HL_DIMENSION_ENTHALPY, cycle->units);
    case S: default: return hl_units_format_number (state->s, HL_DIMENSION_ENTROPY, cycle->units);
    }
}

static char *
head_text (const HlCycle *cycle, guint column, gboolean is_unit)
{
  static const char *const signs[N_COLUMNS] = { "", "p", "T, x", "h", "s" };
  static const HlDimension dimensions[N_COLUMNS] = { HL_DIMENSION_COUNT, HL_DIMENSION_PRESSURE, HL_DIMENSION_TEMPERATURE, HL_DIMENSION_ENTHALPY, HL_DIMENSION_ENTROPY };
  if (column == ID)
    return g_strdup ("");
  return g_strdup (is_unit ? hl_units_label (dimensions[column], cycle->units) : signs[column]);
}

static void
set_cell (HlStateTable *table, guint row, guint column, char *text)
{
  double light = hl_text_width (hl_theme (HL_THEME_LIGHT), text, table->size, row == 0 || column == ID);
  table->cells[row * N_COLUMNS + column] = text;
  table->widths[column] = MAX (table->widths[column], MAX (light, hl_text_width (hl_theme (HL_THEME_PAPER), text, table->size, row == 0 || column == ID)));
}

/* Two rows of heading, then the states as far as there is room; the width that it takes from the diagram. */
double
hl_state_table_set (HlStateTable *table, const HlCycle *cycle, double width, double height, double text_size)
{
  guint n = cycle->points->len;
  if (!(cycle->extras & HL_DIAGRAM_TABLE) || n == 0 || width < 56.0 * text_size)
    return 0.0;
  double room = height - 2.0 * text_size;
  table->size = CLAMP (room / (1.35 * (n + 2.5)), 0.66 * text_size, 0.86 * text_size);
  table->row = 1.35 * table->size;
  guint most = (guint) MAX (1.0, floor (room / table->row - 2.5));
  table->n_rows = MIN (n, most) + 2;
  table->is_cut = n > most;
  table->n_columns = N_COLUMNS;
  table->cells = g_new0 (char *, table->n_rows * N_COLUMNS);
  for (guint column = 0; column < N_COLUMNS; column++)
    {
      set_cell (table, 0, column, head_text (cycle, column, FALSE));
      set_cell (table, 1, column, head_text (cycle, column, TRUE));
      for (guint row = 2; row < table->n_rows; row++)
        set_cell (table, row, column, cell_text (cycle, &g_array_index (cycle->points, HlCyclePoint, row - 2), column));
    }
  for (guint column = 0; column < N_COLUMNS; column++)
    table->width += table->widths[column] + 1.1 * table->size;
  /* Half of the picture stays the diagram's. */
  if (table->width > 0.45 * width)
    {
      hl_state_table_clear (table);
      return 0.0;
    }
  return table->width + text_size;
}

void
hl_state_table_clear (HlStateTable *table)
{
  for (guint k = 0; k < table->n_rows * table->n_columns; k++)
    g_free (table->cells[k]);
  g_free (table->cells);
  memset (table, 0, sizeof *table);
}

void
hl_state_diagram_draw_table (const HlStateDiagram *diagram, cairo_t *cr, const HlTheme *theme)
{
  const HlStateTable *table = &diagram->table;
  double left = diagram->width - table->width - 0.3 * diagram->text_size;
  for (guint row = 0; row < table->n_rows; row++)
    {
      double x = left, y = diagram->frame.y + (row + 0.9) * table->row + (row > 1 ? 0.4 * table->row : 0.0);
      for (guint column = 0; column < table->n_columns; column++)
        {
          x += table->widths[column] + 1.1 * table->size;
          hl_set_colour (cr, row < 2 ? &theme->quiet : &theme->ink);
          hl_text_show (cr, theme, table->cells[row * table->n_columns + column], x - 0.6 * table->size, y, 1, table->size, row == 0 || column == ID);
        }
    }
  if (table->n_rows > 0)
    {
      double y = diagram->frame.y + 2.15 * table->row;
      hl_set_colour (cr, &theme->hairline);
      cairo_set_line_width (cr, 0.8);
      cairo_set_dash (cr, NULL, 0, 0.0);
      cairo_move_to (cr, left, y);
      cairo_line_to (cr, left + table->width, y);
      cairo_stroke (cr);
    }
}
