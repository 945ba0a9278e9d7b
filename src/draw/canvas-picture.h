/* The canvas as a picture, whole or in the parts that the window's canvas composes.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#pragma once
#include "draw/layout.h"
G_BEGIN_DECLS

/* The whole picture in canvas pixels; translate and scale first. @solution may be NULL; a solution that is not solved is drawn stale (grey). */
void hl_draw_canvas          (cairo_t *cr, const HlTheme *theme, const HlLayout *layout, const HlPlant *plant, const HlSolution *solution);
/* The parts. */
void hl_draw_stream_line     (cairo_t *cr, const HlTheme *theme, const HlStreamPlace *place, const HlStreamResult *result, gboolean is_stale, gboolean is_selected);
void hl_draw_stream_label    (cairo_t *cr, const HlTheme *theme, const HlStreamPlace *place, const HlStream *stream, const HlStreamResult *result, gboolean is_stale, gboolean is_selected);
void hl_draw_shaft_line      (cairo_t *cr, const HlTheme *theme, const HlPoint *points, guint n_points);
void hl_draw_component_title (cairo_t *cr, const HlTheme *theme, const HlComponentPlace *place);
void hl_draw_polyline        (cairo_t *cr, const HlPoint *points, guint n_points);   /* path only */
/* Bounds of what the two above draw: leads beneath the symbols, arcs and glow, leader of the label. */
void hl_stream_line_bounds   (const HlStreamPlace *place, HlBox *box);
void hl_stream_label_bounds  (const HlStreamPlace *place, HlBox *box);    /* empty width: nothing */
/* The drawing as a sheet with title line, legend and caution, fitted into width x height points. */
void hl_draw_sheet           (cairo_t *cr, const HlTheme *theme, const HlPlant *plant, const HlSolution *solution, double width, double height);
G_END_DECLS
