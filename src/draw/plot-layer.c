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
  const double dashes[2] = { 3.2 * width, 1.9 * width }, dots[2] = { 1.3, 2.9 };
  /* Butt caps: round ones would close the gaps of dashes, and cost much where dots are many. */
  cairo_set_line_join (cr, CAIRO_LINE_JOIN_ROUND);
  cairo_set_line_cap (cr, dash == HL_PLOT_SOLID ? CAIRO_LINE_CAP_ROUND : CAIRO_LINE_CAP_BUTT);
  cairo_set_dash (cr, dash == HL_PLOT_DASHED ? dashes : dots, dash == HL_PLOT_SOLID ? 0 : 2, 0.0);
}

static void
clip (cairo_t *cr, const HlPlotAxis *x, const HlPlotAxis *y)
{
  cairo_rectangle (cr, MIN (x->pixel_low, x->pixel_high), MIN (y->pixel_low, y->pixel_high),
                   fabs (x->pixel_high - x->pixel_low), fabs (y->pixel_high - y->pixel_low));
  cairo_clip (cr);
}

/* Stretch of the segment inside the box, as shares of its length. */
static gboolean
stretch_in_box (HlPoint a, HlPoint b, const HlBox *box, double *first, double *last)
{
  const double start[2] = { a.x, a.y }, way[2] = { b.x - a.x, b.y - a.y };
  const double low[2] = { box->x, box->y }, high[2] = { box->x + box->width, box->y + box->height };
  *first = 0.0;
  *last = 1.0;
  for (int i = 0; i < 2; i++)
    {
      if (fabs (way[i]) < 1e-12 && (start[i] < low[i] || start[i] > high[i]))
        return FALSE;
      if (fabs (way[i]) >= 1e-12)
        {
          double one = (low[i] - start[i]) / way[i], other = (high[i] - start[i]) / way[i];
          *first = MAX (*first, MIN (one, other));
          *last = MIN (*last, MAX (one, other));
        }
    }
  return *first < *last;
}

/* Cuts the line itself instead of clipping by many boxes, which costs cairo a mask for every stroke. */
static void
segment_with_gaps (cairo_t *cr, HlPoint a, HlPoint b, const HlBox *gaps, guint n_gaps)
{
  double done = 0.0;
  while (done < 1.0)
    {
      double next_first = 1.0, next_last = 1.0;
      for (guint i = 0; i < n_gaps; i++)
        {
          double first, last;
          if (stretch_in_box (a, b, &gaps[i], &first, &last) && last > done && first < next_first)
            {
              next_first = MAX (first, done);
              next_last = last;
            }
        }
      if (next_first > done)
        cairo_line_to (cr, a.x + next_first * (b.x - a.x), a.y + next_first * (b.y - a.y));
      if (next_last > next_first)
        cairo_move_to (cr, a.x + next_last * (b.x - a.x), a.y + next_last * (b.y - a.y));
      done = MAX (next_last, next_first);
    }
}

static void
path_with_gaps (cairo_t *cr, const HlPlotSeries *series, const HlPlotAxis *x, const HlPlotAxis *y, const HlBox *gaps, guint n_gaps)
{
  HlPoint last = { 0.0, 0.0 };
  for (guint i = 0; i < hl_plot_series_n (series); i++)
    {
      const HlPoint *point = hl_plot_series_point (series, i);
      HlPoint at = { hl_plot_axis_to_pixel (x, point->x), hl_plot_axis_to_pixel (y, point->y) };
      if (i == 0)
        cairo_move_to (cr, at.x, at.y);
      else
        segment_with_gaps (cr, last, at, gaps, n_gaps);
      last = at;
    }
}

void
hl_plot_layer_draw (const HlPlotLayer *layer, cairo_t *cr, const HlTheme *theme, const HlPlotAxis *x, const HlPlotAxis *y,
                    const HlBox *gaps, guint n_gaps, gboolean is_stale)
{
  cairo_save (cr);
  clip (cr, x, y);
  for (guint i = 0; i < hl_plot_layer_n (layer); i++)
    {
      const HlPlotSeries *series = hl_plot_layer_series (layer, i);
      if (n_gaps > 0)
        path_with_gaps (cr, series, x, y, gaps, n_gaps);
      else
        hl_plot_series_path (series, cr, x, y, TRUE);
      hl_set_colour (cr, hl_plot_colour (theme, series->colour, is_stale));
      cairo_set_line_width (cr, series->width);
      set_dash (cr, series->dash, series->width);
      cairo_stroke (cr);
    }
  cairo_restore (cr);
}
