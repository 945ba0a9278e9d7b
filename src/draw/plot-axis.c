/* One axis of a plot: a range in SI on a range of pixels, with round ticks in the units of a unit set.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "draw/plot-axis.h"
#include "draw/text.h"
#include <math.h>

/* The least of 1, 2, 5 times a power of ten that is at least @wanted. */
static double
round_step (double wanted)
{
  double decade = pow (10.0, floor (log10 (wanted)));
  double mantissa = wanted / decade;
  return decade * (mantissa <= 1.0 + 1e-9 ? 1.0 : mantissa <= 2.0 + 1e-9 ? 2.0 : mantissa <= 5.0 + 1e-9 ? 5.0 : 10.0);
}

/* Ends of the range lie on multiples of this: half a step of 1, a quarter of 2, a fifth of 5. */
static double
round_end (double step)
{
  double mantissa = step / pow (10.0, floor (log10 (step) + 1e-9));
  return step / (mantissa < 1.5 ? 2.0 : mantissa < 3.5 ? 4.0 : 5.0);
}

static int
decimals_of (double step)
{
  int decimals = (int) ceil (-log10 (step) - 1e-9);
  return CLAMP (decimals, 0, 9);
}

static void
set_ticks (HlPlotAxis *axis, double shown_low, double shown_high)
{
  int decimals = decimals_of (axis->step);
  axis->n_ticks = 0;
  for (double k = ceil (shown_low / axis->step - 1e-6); k <= shown_high / axis->step + 1e-6 && axis->n_ticks < HL_PLOT_MAX_TICKS; k++)
    {
      double shown = k * axis->step;
      axis->ticks[axis->n_ticks] = hl_units_from_display (shown, axis->dimension, axis->units);
      /* Adding 0 turns -0 into 0. */
      g_snprintf (axis->tick_texts[axis->n_ticks], sizeof axis->tick_texts[0], "%.*f", decimals, shown + 0.0);
      axis->n_ticks++;
    }
}

void
hl_plot_axis_set (HlPlotAxis *axis, HlDimension dimension, HlUnitSet units, double low, double high,
                  double pixel_low, double pixel_high, double spacing)
{
  double shown_low = hl_units_to_display (low, dimension, units), shown_high = hl_units_to_display (high, dimension, units);
  double length = fabs (pixel_high - pixel_low), end;
  if (!(shown_high > shown_low))
    shown_high = shown_low + MAX (1e-9, fabs (shown_low) * 1e-6);
  axis->dimension = dimension;
  axis->units = units;
  axis->is_log = FALSE;
  axis->pixel_low = pixel_low;
  axis->pixel_high = pixel_high;
  axis->step = round_step ((shown_high - shown_low) / CLAMP (length / spacing, 1.0, HL_PLOT_MAX_TICKS - 4));
  end = round_end (axis->step);
  /* A range that misses a round end by less than a thousandth keeps to it. */
  shown_low = end * floor (shown_low / end + 2e-3);
  shown_high = end * ceil (shown_high / end - 2e-3);
  axis->low = hl_units_from_display (shown_low, dimension, units);
  axis->high = hl_units_from_display (shown_high, dimension, units);
  set_ticks (axis, shown_low, shown_high);
}

/* Figures of a decade, from one to three of them. */
static const double mantissas[3][3] = { { 1.0 }, { 1.0, 3.0 }, { 1.0, 2.0, 5.0 } };

static double
round_log (double shown, int n, gboolean is_up)
{
  double decade = pow (10.0, floor (log10 (shown) + 1e-9)), best = decade;
  for (int i = 0; i < n; i++)
    {
      double here = decade * mantissas[n - 1][i];
      if (is_up && here >= shown * (1.0 - 1e-9))
        return here;
      if (here <= shown * (1.0 + 1e-9))
        best = here;
    }
  return is_up ? 10.0 * decade : best;
}

/* Without exponent and needless zeros: 0.05, 1, 200. */
static void
set_log_ticks (HlPlotAxis *axis, double shown_low, double shown_high, int n, int stride)
{
  axis->n_ticks = 0;
  for (int k = (int) floor (log10 (shown_low) + 1e-9); pow (10.0, k) <= shown_high * (1.0 + 1e-9); k++)
    for (int i = 0; i < n && axis->n_ticks < HL_PLOT_MAX_TICKS; i++)
      {
        double shown = pow (10.0, k) * mantissas[n - 1][i];
        if (shown < shown_low * (1.0 - 1e-9) || shown > shown_high * (1.0 + 1e-9) || (stride > 1 && ((k % stride) + stride) % stride != 0))
          continue;
        axis->ticks[axis->n_ticks] = hl_units_from_display (shown, axis->dimension, axis->units);
        g_snprintf (axis->tick_texts[axis->n_ticks], sizeof axis->tick_texts[0], "%.*f", MAX (0, -k), shown);
        axis->n_ticks++;
      }
}

void
hl_plot_axis_set_log (HlPlotAxis *axis, HlDimension dimension, HlUnitSet units, double low, double high,
                      double pixel_low, double pixel_high, double spacing)
{
  double shown_low = hl_units_to_display (low, dimension, units), shown_high = hl_units_to_display (high, dimension, units), decade;
  int n, stride = 1;
  g_return_if_fail (shown_low > 0.0);
  shown_high = MAX (shown_high, shown_low * 1.5);
  decade = fabs (pixel_high - pixel_low) / log10 (shown_high / shown_low);
  /* The least gaps within a decade are those from 5 to 10 and 1 to 2, and from 3 to 10. */
  n = decade * log10 (2.0) >= spacing ? 3 : decade * log10 (3.0) >= spacing ? 2 : 1;
  while (n == 1 && decade * stride < spacing)
    stride++;
  axis->dimension = dimension;
  axis->units = units;
  axis->is_log = TRUE;
  axis->pixel_low = pixel_low;
  axis->pixel_high = pixel_high;
  axis->step = 0.0;
  shown_low = round_log (shown_low, 3, FALSE);
  shown_high = round_log (shown_high, 3, TRUE);
  axis->low = hl_units_from_display (shown_low, dimension, units);
  axis->high = hl_units_from_display (shown_high, dimension, units);
  set_log_ticks (axis, shown_low, shown_high, n, stride);
}

double
hl_plot_axis_to_pixel (const HlPlotAxis *axis, double value)
{
  if (axis->is_log)
    return axis->pixel_low + log (MAX (value, 1e-300) / axis->low) / log (axis->high / axis->low) * (axis->pixel_high - axis->pixel_low);
  return axis->pixel_low + (value - axis->low) / (axis->high - axis->low) * (axis->pixel_high - axis->pixel_low);
}

double
hl_plot_axis_from_pixel (const HlPlotAxis *axis, double pixel)
{
  if (axis->is_log)
    return axis->low * pow (axis->high / axis->low, (pixel - axis->pixel_low) / (axis->pixel_high - axis->pixel_low));
  return axis->low + (pixel - axis->pixel_low) / (axis->pixel_high - axis->pixel_low) * (axis->high - axis->low);
}

char *
hl_plot_axis_title (const HlPlotAxis *axis, const char *name)
{
  const char *unit = hl_units_label (axis->dimension, axis->units);
  return unit[0] != '\0' ? g_strdup_printf ("%s %s", name, unit) : g_strdup (name);
}

double
hl_plot_axis_room_left (double text_size)
{
  return 4.9 * text_size;
}

double
hl_plot_axis_room_below (double text_size)
{
  return 3.5 * text_size;
}

/* Lines of one pixel look sharp when they lie on the middle of one. */
static double
sharp (double pixel)
{
  return floor (pixel) + 0.5;
}

void
hl_plot_axes_draw_grid (cairo_t *cr, const HlTheme *theme, const HlPlotAxis *x, const HlPlotAxis *y)
{
  cairo_save (cr);
  cairo_set_line_width (cr, 1.0);
  cairo_set_dash (cr, NULL, 0, 0.0);
  for (guint i = 0; i < x->n_ticks; i++)
    {
      double at = sharp (hl_plot_axis_to_pixel (x, x->ticks[i]));
      cairo_move_to (cr, at, y->pixel_low);
      cairo_line_to (cr, at, y->pixel_high);
    }
  for (guint i = 0; i < y->n_ticks; i++)
    {
      double at = sharp (hl_plot_axis_to_pixel (y, y->ticks[i]));
      cairo_move_to (cr, x->pixel_low, at);
      cairo_line_to (cr, x->pixel_high, at);
    }
  hl_set_colour (cr, &theme->grid);
  cairo_stroke (cr);
  cairo_restore (cr);
}

void
hl_plot_axes_draw_frame (cairo_t *cr, const HlTheme *theme, const HlPlotAxis *x, const HlPlotAxis *y,
                         const char *x_title, const char *y_title, double text_size)
{
  double left = sharp (x->pixel_low), bottom = sharp (y->pixel_low), title_size = text_size * 1.05;
  cairo_save (cr);
  cairo_set_line_width (cr, 1.0);
  cairo_set_dash (cr, NULL, 0, 0.0);
  cairo_set_line_join (cr, CAIRO_LINE_JOIN_MITER);
  cairo_move_to (cr, left, y->pixel_high);
  cairo_line_to (cr, left, bottom);
  cairo_line_to (cr, x->pixel_high, bottom);
  hl_set_colour (cr, &theme->quiet);
  cairo_stroke (cr);
  for (guint i = 0; i < x->n_ticks; i++)
    hl_text_show (cr, theme, x->tick_texts[i], hl_plot_axis_to_pixel (x, x->ticks[i]), bottom + 1.45 * text_size, 0, text_size, FALSE);
  for (guint i = 0; i < y->n_ticks; i++)
    hl_text_show (cr, theme, y->tick_texts[i], left - 0.6 * text_size, hl_plot_axis_to_pixel (y, y->ticks[i]) + 0.36 * text_size, 1, text_size, FALSE);
  hl_text_show (cr, theme, x_title, (x->pixel_low + x->pixel_high) / 2.0, bottom + 2.95 * text_size, 0, title_size, FALSE);
  cairo_translate (cr, left - 3.75 * text_size, (y->pixel_low + y->pixel_high) / 2.0);
  cairo_rotate (cr, -G_PI / 2.0);
  hl_text_show (cr, theme, y_title, 0.0, 0.0, 0, title_size, FALSE);
  cairo_restore (cr);
}
