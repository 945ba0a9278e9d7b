/* Lines of plots on the surface: inside the axes only, gaps left out, dashes.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "draw/plot-layer.h"

#define SIDE 100

/* Temperatures 300 to 400 K on pixels 20 to 80, both ways; the range is round, so that it stays. */
static void
set_axes (HlPlotAxis *x, HlPlotAxis *y)
{
  hl_plot_axis_set (x, HL_DIMENSION_TEMPERATURE, HL_UNITS_SI, 300.0, 400.0, 20.0, 80.0, 10.0);
  hl_plot_axis_set (y, HL_DIMENSION_TEMPERATURE, HL_UNITS_SI, 300.0, 400.0, 80.0, 20.0, 10.0);
}

static cairo_surface_t *
draw (HlPlotDash dash, const HlBox *gap)
{
  cairo_surface_t *surface = cairo_image_surface_create (CAIRO_FORMAT_A8, SIDE, SIDE);
  cairo_t *cr = cairo_create (surface);
  g_autoptr (HlPlotLayer) layer = hl_plot_layer_new ();
  HlPlotSeries *series = hl_plot_series_new (HL_PLOT_INK, dash, 2.0);
  HlPlotAxis x, y;
  set_axes (&x, &y);
  /* A level line far beyond both ends of the axes. */
  hl_plot_series_add (series, 200.0, 350.0);
  hl_plot_series_add (series, 370.0, 350.0);
  hl_plot_series_add (series, 500.0, 350.0);
  hl_plot_layer_add (layer, series);
  g_assert_cmpuint (hl_plot_layer_n (layer), ==, 1);
  hl_plot_layer_draw (layer, cr, hl_theme (HL_THEME_LIGHT), &x, &y, gap, gap != NULL ? 1 : 0, FALSE);
  cairo_destroy (cr);
  cairo_surface_flush (surface);
  return surface;
}

static guint
ink (cairo_surface_t *surface, int left, int top, int right, int bottom)
{
  const unsigned char *data = cairo_image_surface_get_data (surface);
  int stride = cairo_image_surface_get_stride (surface);
  guint sum = 0;
  for (int row = top; row < bottom; row++)
    for (int column = left; column < right; column++)
      sum += data[row * stride + column];
  return sum;
}

static void
test_lines_end_at_the_axes (void)
{
  cairo_surface_t *surface = draw (HL_PLOT_SOLID, NULL);
  g_assert_cmpuint (ink (surface, 20, 49, 80, 51), ==, 255 * 2 * 60);
  g_assert_cmpuint (ink (surface, 0, 0, 20, SIDE), ==, 0);
  g_assert_cmpuint (ink (surface, 80, 0, SIDE, SIDE), ==, 0);
  cairo_surface_destroy (surface);
}

static void
test_gaps_stay_empty (void)
{
  const HlBox gap = { 40.0, 45.0, 15.0, 10.0 };
  cairo_surface_t *surface = draw (HL_PLOT_SOLID, &gap);
  /* Round caps of one pixel reach into the gap. */
  g_assert_cmpuint (ink (surface, 41, 40, 54, 60), ==, 0);
  g_assert_cmpuint (ink (surface, 20, 49, 40, 51), ==, 255 * 2 * 20);
  g_assert_cmpuint (ink (surface, 55, 49, 80, 51), ==, 255 * 2 * 25);
  cairo_surface_destroy (surface);
}

static void
test_dashes_have_gaps_and_dots_have_more (void)
{
  cairo_surface_t *solid = draw (HL_PLOT_SOLID, NULL), *dashed = draw (HL_PLOT_DASHED, NULL), *dotted = draw (HL_PLOT_DOTTED, NULL);
  guint all = ink (solid, 20, 40, 80, 60), dashes = ink (dashed, 20, 40, 80, 60), dots = ink (dotted, 20, 40, 80, 60);
  g_assert_cmpuint (dashes, <, all * 3 / 4);
  g_assert_cmpuint (dots, <, dashes * 3 / 4);
  g_assert_cmpuint (dots, >, all / 8);
  cairo_surface_destroy (solid);
  cairo_surface_destroy (dashed);
  cairo_surface_destroy (dotted);
}

int
main (int argc, char **argv)
{
  g_test_init (&argc, &argv, NULL);
  g_test_add_func ("/draw/plot-layer/lines-end-at-the-axes", test_lines_end_at_the_axes);
  g_test_add_func ("/draw/plot-layer/gaps-stay-empty", test_gaps_stay_empty);
  g_test_add_func ("/draw/plot-layer/dashes-have-gaps", test_dashes_have_gaps_and_dots_have_more);
  return g_test_run ();
}
