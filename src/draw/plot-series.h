/* A line of a plot: points in data coordinates with the pen that draws them.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#pragma once
#include "draw/layout.h"
G_BEGIN_DECLS

/* What a line means; the theme gives the colour. */
typedef enum {
  HL_PLOT_INK,
  HL_PLOT_QUIET,
  HL_PLOT_HAIRLINE,
  HL_PLOT_OUTLINE,      /* the saturation line */
  HL_PLOT_STEAM,
  HL_PLOT_WET,
  HL_PLOT_WATER,
  HL_PLOT_COOLING,
  HL_PLOT_GAS,
  HL_PLOT_ACCENT,
} HlPlotColour;
const HlColour *hl_plot_colour (const HlTheme *theme, HlPlotColour colour, gboolean is_stale);

typedef enum { HL_PLOT_SOLID, HL_PLOT_DASHED, HL_PLOT_DOTTED } HlPlotDash;

typedef struct {
  HlPlotColour colour;
  HlPlotDash   dash;
  double       width;     /* pixels */
  GArray      *points;    /* of HlPoint, x and y in SI */
} HlPlotSeries;
HlPlotSeries  *hl_plot_series_new  (HlPlotColour colour, HlPlotDash dash, double width);
void           hl_plot_series_free (HlPlotSeries *series);
void           hl_plot_series_add  (HlPlotSeries *series, double x, double y);
guint          hl_plot_series_n    (const HlPlotSeries *series);
const HlPoint *hl_plot_series_point (const HlPlotSeries *series, guint n);
G_DEFINE_AUTOPTR_CLEANUP_FUNC (HlPlotSeries, hl_plot_series_free)
G_END_DECLS
