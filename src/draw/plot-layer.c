/* Lines of a plot that are drawn together, clipped to the axes.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "draw/plot-layer.h"
#include <math.h>

static void
series_free (gpointer series)
{
  hl_plot_series_free (series);
}

HlPlotLayer *
hl_plot_layer_new (void)
{
  HlPlotLayer *layer = g_new0 (HlPlotLayer, 1);
  layer->series = g_ptr_array_new_with_free_func (series_free);
  return layer;
}

void
hl_plot_layer_free (HlPlotLayer *layer)
{
  if (layer == NULL)
    return;
  g_ptr_array_unref (layer->series);
  g_free (layer);
}

void
hl_plot_layer_add (HlPlotLayer *layer, HlPlotSeries *series)
{
  g_ptr_array_add (layer->series, series);
}

guint
hl_plot_layer_n (const HlPlotLayer *layer)
{
  return layer->series->len;
}

const HlPlotSeries *
hl_plot_layer_series (const HlPlotLayer *layer, guint n)
{
  g_return_val_if_fail (n < layer->series->len, NULL);
  return g_ptr_array_index (layer->series, n);
}

void
hl_plot_series_path (const HlPlotSeries *series, cairo_t *cr, const HlPlotAxis *x, const HlPlotAxis *y, gboolean starts_new)
{
  for (guint i = 0; i < hl_plot_series_n (series); i++)
    {
      const HlPoint *point = hl_plot_series_point (series, i);
      double at_x = hl_plot_axis_to_pixel (x, point->x), at_y = hl_plot_axis_to_pixel (y, point->y);
      if (i == 0 && starts_new)
        cairo_move_to (cr, at_x, at_y);
      else
        cairo_line_to (cr, at_x, at_y);
    }
}

static void
set_dash (cairo_t *cr, HlPlotDash dash, double width)
{
  const double dashes[2] = { 3.2 * width, 1.9 * width }, dots[2] = { 0.0, 3.0 };
  cairo_set_line_join (cr, CAIRO_LINE_JOIN_ROUND);
  /* Round dots of no length; dashes end square, else they would close their gaps. */
  cairo_set_line_cap (cr, dash == HL_PLOT_DASHED ? CAIRO_LINE_CAP_BUTT : CAIRO_LINE_CAP_ROUND);
  cairo_set_dash (cr, dash == HL_PLOT_DASHED ? dashes : dots, dash == HL_PLOT_SOLID ? 0 : 2, 0.0);
}

/* The gaps do not overlap each other, so that the even-odd rule leaves each of them out. */
static void
clip (cairo_t *cr, const HlPlotAxis *x, const HlPlotAxis *y, const HlBox *gaps, guint n_gaps)
{
  double left = MIN (x->pixel_low, x->pixel_high), top = MIN (y->pixel_low, y->pixel_high);
  double width = fabs (x->pixel_high - x->pixel_low), height = fabs (y->pixel_high - y->pixel_low);
  cairo_rectangle (cr, left, top, width, height);
  cairo_clip (cr);
  if (n_gaps == 0)
    return;
  cairo_set_fill_rule (cr, CAIRO_FILL_RULE_EVEN_ODD);
  cairo_rectangle (cr, left - 9.0, top - 9.0, width + 18.0, height + 18.0);
  for (guint i = 0; i < n_gaps; i++)
    cairo_rectangle (cr, gaps[i].x, gaps[i].y, gaps[i].width, gaps[i].height);
  cairo_clip (cr);
}

void
hl_plot_layer_draw (const HlPlotLayer *layer, cairo_t *cr, const HlTheme *theme, const HlPlotAxis *x, const HlPlotAxis *y,
                    const HlBox *gaps, guint n_gaps, gboolean is_stale)
{
  cairo_save (cr);
  clip (cr, x, y, gaps, n_gaps);
  for (guint i = 0; i < hl_plot_layer_n (layer); i++)
    {
      const HlPlotSeries *series = hl_plot_layer_series (layer, i);
      hl_plot_series_path (series, cr, x, y, TRUE);
      hl_set_colour (cr, hl_plot_colour (theme, series->colour, is_stale));
      cairo_set_line_width (cr, series->width);
      set_dash (cr, series->dash, series->width);
      cairo_stroke (cr);
    }
  cairo_restore (cr);
}
