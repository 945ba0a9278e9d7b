/* The drawing as a sheet to hand over.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "draw/sheet.h"
#include <math.h>
#include "draw/text.h"
#include "plant/i18n.h"

#define SIDE          28.0     /* margin left and right */
#define HEAD          66.0     /* height of title and key results */
#define FOOT          62.0     /* height of legend and caution */
#define LEAST_WIDTH   900.0
#define LARGEST_SCALE 1.5
#define TITLE_SIZE    17.0
#define TEXT_SIZE     10.5
#define SMALL_SIZE    9.5

void
hl_sheet_usual_size (const HlTheme *theme, const HlPlant *plant, const HlSolution *solution, double *width, double *height)
{
  g_autoptr (HlLayout) layout = hl_layout_new (plant, solution, theme);
  HlBox extents;
  hl_layout_extents (layout, &extents);
  *width = ceil (MAX (extents.width + 2.0 * SIDE, LEAST_WIDTH));
  *height = ceil (extents.height + HEAD + FOOT);
}

static void
rule (cairo_t *cr, const HlTheme *theme, double y, double width)
{
  hl_set_colour (cr, &theme->hairline);
  cairo_set_line_width (cr, 1.0);
  cairo_set_dash (cr, NULL, 0, 0.0);
  cairo_move_to (cr, SIDE, y);
  cairo_line_to (cr, width - SIDE, y);
  cairo_stroke (cr);
}

/* The results that a reader asks for first, of those the solution has. */
static const char *const key_results[] = {
  "net_power", "gross_power", "heat_delivered", "heat_input", "fuel_heat", "cycle_efficiency", "net_efficiency_lhv", "utilisation", "heat_rate",
};

static const HlQuantityKind *
find_result (const HlSolution *solution, const char *key, double *value)
{
  for (guint n = 0; n < hl_solution_n_results (solution); n++)
    {
      const HlQuantityKind *kind = hl_solution_result (solution, n, value);
      if (g_str_equal (kind->key, key) && isfinite (*value))
        return kind;
    }
  return NULL;
}

static char *
result_text (const HlQuantityKind *kind, double value, HlUnitSet units)
{
  /* Efficiencies of a whole plant are quoted in per cent. */
  if (kind->dimension == HL_DIMENSION_RATIO)
    return g_strdup_printf ("%.2f %%", value * 100.0);
  return hl_units_format (value, kind->dimension, units);
}

/* "Net power 13.70 MW", the number heavier than its name. Returns where the next may begin. */
static double
draw_result (cairo_t *cr, const HlTheme *theme, const char *name, const char *text, double x, double y)
{
  hl_set_colour (cr, &theme->quiet);
  x += hl_text_show (cr, theme, name, x, y, -1, TEXT_SIZE, FALSE) + 6.0;
  hl_set_colour (cr, &theme->ink);
  return x + hl_text_show (cr, theme, text, x, y, -1, TEXT_SIZE, TRUE) + 22.0;
}

static void
draw_key_results (cairo_t *cr, const HlTheme *theme, const HlPlant *plant, const HlSolution *solution, double y, double width)
{
  double x = SIDE;
  for (guint i = 0; i < G_N_ELEMENTS (key_results); i++)
    {
      double value;
      const HlQuantityKind *kind = find_result (solution, key_results[i], &value);
      g_autofree char *text = NULL;
      if (kind == NULL)
        continue;
      text = result_text (kind, value, hl_plant_units (plant));
      if (x + hl_text_width (theme, _(kind->name), TEXT_SIZE, FALSE) + 6.0 + hl_text_width (theme, text, TEXT_SIZE, TRUE) > width - SIDE)
        return;
      x = draw_result (cr, theme, _(kind->name), text, x, y);
    }
}

static void
draw_head (cairo_t *cr, const HlTheme *theme, const HlPlant *plant, const HlSolution *solution, double width)
{
  const char *title = hl_plant_title (plant);
  hl_set_colour (cr, &theme->ink);
  hl_text_show (cr, theme, title != NULL && *title != '\0' ? title : _("Plant without a title"), SIDE, 29.0, -1, TITLE_SIZE, TRUE);
  if (solution != NULL && hl_solution_is_solved (solution))
    draw_key_results (cr, theme, plant, solution, 49.0, width);
  else
    {
      hl_set_colour (cr, solution != NULL ? &theme->warning : &theme->quiet);
      hl_text_show (cr, theme, solution != NULL ? _("Not solved: figures shown are incomplete") : _("Drawing without figures"),
                    SIDE, 49.0, -1, TEXT_SIZE, FALSE);
    }
  rule (cr, theme, HEAD - 6.0, width);
}

/* Steam and condensate are words of water; a drawing that holds another medium with a dome says vapour and liquid. */
static const char *
look_name (const HlPlant *plant, HlLook look)
{
  static const HlPhase phases[] = { [HL_LOOK_STEAM] = HL_PHASE_VAPOUR, [HL_LOOK_WET] = HL_PHASE_TWO_PHASE, [HL_LOOK_WATER] = HL_PHASE_LIQUID };
  if (look != HL_LOOK_STEAM && look != HL_LOOK_WET && look != HL_LOOK_WATER)
    return hl_look_name (look);
  for (guint i = 0; i < hl_plant_n_streams (plant); i++)
    {
      const char *medium = hl_plant_stream (plant, i)->medium;
      const HlFluid *fluid = hl_fluid_lookup (medium);
      if (fluid != NULL && hl_fluid_has_dome (fluid) && !g_str_has_prefix (medium, "water"))
        return _(hl_phase_name (phases[look]));
    }
  return hl_look_name (look);
}

/* A short line of each medium that the drawing holds, with its name. */
static void
draw_media (cairo_t *cr, const HlTheme *theme, const HlLayout *layout, const HlPlant *plant, double x, double y)
{
  gboolean is_there[HL_N_LOOKS] = { FALSE };
  for (guint i = 0; i < hl_plant_n_streams (plant); i++)
    is_there[hl_layout_stream (layout, i)->look] = TRUE;
  for (int look = 0; look < HL_N_LOOKS; look++)
    {
      if (!is_there[look] || look == HL_LOOK_UNKNOWN)
        continue;
      hl_set_look_pen (cr, theme, look, FALSE);
      cairo_move_to (cr, x, y - 3.5);
      cairo_line_to (cr, x + 26.0, y - 3.5);
      cairo_stroke (cr);
      hl_set_colour (cr, &theme->quiet);
      x += 32.0 + hl_text_show (cr, theme, look_name (plant, look), x + 32.0, y, -1, SMALL_SIZE, FALSE) + 20.0;
    }
  if (hl_layout_n_shafts (layout) > 0)
    {
      const HlPoint shaft[2] = { { x, y - 3.5 }, { x + 26.0, y - 3.5 } };
      hl_draw_shaft_line (cr, theme, shaft, 2);
      hl_set_colour (cr, &theme->quiet);
      hl_text_show (cr, theme, _("shaft"), x + 32.0, y, -1, SMALL_SIZE, FALSE);
    }
}

static void
draw_foot (cairo_t *cr, const HlTheme *theme, const HlLayout *layout, const HlPlant *plant, double width, double height)
{
  double top = height - FOOT + 8.0;
  rule (cr, theme, top, width);
  draw_media (cr, theme, layout, plant, SIDE, top + 20.0);
  hl_set_colour (cr, &theme->quiet);
  hl_text_show (cr, theme, _("flow · pressure (a) · temperature or quality"), width - SIDE, top + 20.0, 1, SMALL_SIZE, FALSE);
  hl_text_show (cr, theme, _("Concept figures only: not for construction, operation or purchase; local codes and licensed practice decide."),
                SIDE, top + 40.0, -1, SMALL_SIZE, FALSE);
  hl_text_show (cr, theme, _("Heatloom"), width - SIDE, top + 40.0, 1, SMALL_SIZE, FALSE);
}

static void
draw_fitted (cairo_t *cr, const HlTheme *theme, const HlLayout *layout, const HlPlant *plant, const HlSolution *solution, double width, double height)
{
  double room_width = width - 2.0 * SIDE, room_height = height - HEAD - FOOT, scale;
  HlBox extents;
  hl_layout_extents (layout, &extents);
  if (extents.width <= 0.0 || extents.height <= 0.0 || room_width <= 0.0 || room_height <= 0.0)
    return;
  scale = MIN (MIN (room_width / extents.width, room_height / extents.height), LARGEST_SCALE);
  cairo_save (cr);
  cairo_translate (cr, width / 2.0, HEAD + room_height / 2.0);
  cairo_scale (cr, scale, scale);
  cairo_translate (cr, -extents.x - extents.width / 2.0, -extents.y - extents.height / 2.0);
  hl_draw_canvas (cr, theme, layout, plant, solution);
  cairo_restore (cr);
}

void
hl_draw_sheet (cairo_t *cr, const HlTheme *theme, const HlPlant *plant, const HlSolution *solution, double width, double height)
{
  g_autoptr (HlLayout) layout = hl_layout_new (plant, solution, theme);
  cairo_save (cr);
  draw_fitted (cr, theme, layout, plant, solution, width, height);
  draw_head (cr, theme, plant, solution, width);
  draw_foot (cr, theme, layout, plant, width, height);
  cairo_restore (cr);
}
