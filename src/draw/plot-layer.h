/* Lines of a plot that are drawn together, clipped to the axes.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#pragma once
#include "draw/plot-axis.h"
#include "draw/plot-series.h"
G_BEGIN_DECLS

typedef struct {
  GPtrArray *series;     /* of HlPlotSeries, drawn in this order */
} HlPlotLayer;
HlPlotLayer        *hl_plot_layer_new  (void);
void                hl_plot_layer_free (HlPlotLayer *layer);
/* Takes the series over. */
void                hl_plot_layer_add  (HlPlotLayer *layer, HlPlotSeries *series);
guint               hl_plot_layer_n    (const HlPlotLayer *layer);
const HlPlotSeries *hl_plot_layer_series (const HlPlotLayer *layer, guint n);
/* Strokes every line inside the axes; @gaps: boxes in pixels where nothing is drawn, so that texts stand free. */
void                hl_plot_layer_draw (const HlPlotLayer *layer, cairo_t *cr, const HlTheme *theme, const HlPlotAxis *x, const HlPlotAxis *y,
                                        const HlBox *gaps, guint n_gaps, gboolean is_stale);
/* Path of one series in pixels, for fills. */
void                hl_plot_series_path (const HlPlotSeries *series, cairo_t *cr, const HlPlotAxis *x, const HlPlotAxis *y, gboolean starts_new);
G_DEFINE_AUTOPTR_CLEANUP_FUNC (HlPlotLayer, hl_plot_layer_free)
G_END_DECLS
