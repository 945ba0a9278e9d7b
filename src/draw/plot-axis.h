/* One axis of a plot: a range in SI on a range of pixels, with round ticks in the units of a unit set.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#pragma once
#include "draw/layout.h"
G_BEGIN_DECLS

#define HL_PLOT_MAX_TICKS 32

/* A plain value: nothing to free. */
typedef struct {
  HlDimension dimension;
  HlUnitSet   units;
  gboolean    is_log;                             /* equal ratios are equally far apart; low above 0 */
  double      low, high;                          /* ends of the range [SI] */
  double      pixel_low, pixel_high;              /* where they lie; pixel_low > pixel_high for an axis that runs up */
  double      step;                               /* between ticks [unit shown] */
  guint       n_ticks;
  double      ticks[HL_PLOT_MAX_TICKS];           /* [SI] */
  char        tick_texts[HL_PLOT_MAX_TICKS][16];
} HlPlotAxis;

/* The least round range that holds @low to @high [SI]: ends on ticks or a round part of a step beyond; ticks stand at least @spacing pixels apart. */
void   hl_plot_axis_set        (HlPlotAxis *axis, HlDimension dimension, HlUnitSet units, double low, double high,
                                double pixel_low, double pixel_high, double spacing);
/* The same by decades: ends and ticks at 1, 2 and 5 times a power of ten, or at powers of ten only where there is less room. */
void   hl_plot_axis_set_log    (HlPlotAxis *axis, HlDimension dimension, HlUnitSet units, double low, double high,
                                double pixel_low, double pixel_high, double spacing);
double hl_plot_axis_to_pixel   (const HlPlotAxis *axis, double value);
double hl_plot_axis_from_pixel (const HlPlotAxis *axis, double pixel);
/* "temperature °C"; g_free(). */
char  *hl_plot_axis_title      (const HlPlotAxis *axis, const char *name);
/* Grid lines of two axes, and the figures along them. */
void   hl_plot_axes_draw_grid  (cairo_t *cr, const HlTheme *theme, const HlPlotAxis *x, const HlPlotAxis *y);
void   hl_plot_axes_draw_frame (cairo_t *cr, const HlTheme *theme, const HlPlotAxis *x, const HlPlotAxis *y,
                                const char *x_title, const char *y_title, double text_size);
/* Room that figures and title need left of and below the plot [pixels]. */
double hl_plot_axis_room_left  (double text_size);
double hl_plot_axis_room_below (double text_size);
G_END_DECLS
