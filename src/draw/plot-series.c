/* A line of a plot: points in data coordinates with the pen that draws them.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "draw/plot-series.h"

const HlColour *
hl_plot_colour (const HlTheme *theme, HlPlotColour colour, gboolean is_stale)
{
  switch (colour)
    {
    case HL_PLOT_STEAM:
      return is_stale ? &theme->stale : &theme->steam;
    case HL_PLOT_WET:
      return is_stale ? &theme->stale : &theme->wet;
    case HL_PLOT_WATER:
      return is_stale ? &theme->stale : &theme->water;
    case HL_PLOT_COOLING:
      return is_stale ? &theme->stale : &theme->cooling;
    case HL_PLOT_GAS:
      return is_stale ? &theme->stale : &theme->gas;
    case HL_PLOT_ACCENT:
      return &theme->accent;
    case HL_PLOT_OUTLINE:
      return is_stale ? &theme->quiet : &theme->dome_line;
    case HL_PLOT_HAIRLINE:
      return &theme->hairline;
    case HL_PLOT_QUIET:
      return is_stale ? &theme->stale : &theme->quiet;
    case HL_PLOT_INK:
    default:
      return is_stale ? &theme->quiet : &theme->ink;
    }
}

HlPlotSeries *
hl_plot_series_new (HlPlotColour colour, HlPlotDash dash, double width)
{
  HlPlotSeries *series = g_new0 (HlPlotSeries, 1);
  series->colour = colour;
  series->dash = dash;
  series->width = width;
  series->points = g_array_new (FALSE, FALSE, sizeof (HlPoint));
  return series;
}

void
hl_plot_series_free (HlPlotSeries *series)
{
  if (series == NULL)
    return;
  g_array_unref (series->points);
  g_free (series);
}

void
hl_plot_series_add (HlPlotSeries *series, double x, double y)
{
  HlPoint point = { x, y };
  g_array_append_val (series->points, point);
}

guint
hl_plot_series_n (const HlPlotSeries *series)
{
  return series->points->len;
}

const HlPoint *
hl_plot_series_point (const HlPlotSeries *series, guint n)
{
  g_return_val_if_fail (n < series->points->len, NULL);
  return &g_array_index (series->points, HlPoint, n);
}
