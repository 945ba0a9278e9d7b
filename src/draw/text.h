/* Text in pictures: one look on every surface, the same bytes on every machine for the same font.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#pragma once
#include <pango/pangocairo.h>
#include "draw/theme.h"
G_BEGIN_DECLS

/* Family that exports use, whatever the theme says. */
#define HL_EXPORT_FONT "DejaVu Sans"

/* A layout with hinting off and tabular figures; @size in pixels.  g_object_unref(). */
PangoLayout *hl_text_layout (cairo_t *cr, const HlTheme *theme, const char *text, double size, gboolean is_bold);
/* Width of one line in pixels without a cairo context; fast, close enough to place it. */
double       hl_text_width  (const HlTheme *theme, const char *text, double size, gboolean is_bold);
/* One line with its baseline at @y; @align -1 starts at @x, 0 is centred, 1 ends there. Colour as set in @cr. Returns the width. */
double       hl_text_show   (cairo_t *cr, const HlTheme *theme, const char *text, double x, double y, int align, double size, gboolean is_bold);
G_END_DECLS
