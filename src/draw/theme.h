/* Colours and weights of every picture: light and dark window, paper.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#pragma once
#include <cairo.h>
#include "engine/engine.h"
#include "engine/heat-curve.h"
G_BEGIN_DECLS

typedef struct { double r, g, b, a; } HlColour;
typedef enum { HL_THEME_LIGHT, HL_THEME_DARK, HL_THEME_PAPER, HL_N_THEMES } HlThemeId;
typedef struct {
  HlColour ground, card, ink, quiet, hairline, grid, accent, selection;   /* surfaces, text, marks */
  HlColour steam, wet, water, cooling, gas, shaft, stale;                 /* media by state; stale: last solve failed */
  HlColour given, assumed, tied, found;                                   /* origins */
  HlColour hint, caution, warning, error, good;
  HlColour dome_fill, dome_line;
  const char *font;                                                       /* pango family list */
} HlTheme;
const HlTheme *hl_theme (HlThemeId id);
void           hl_set_colour (cairo_t *cr, const HlColour *colour);

/* How a line looks: medium and state together, HlLook. */
const char     *hl_look_name   (HlLook look);                             /* translated, for legends */
const HlColour *hl_look_colour (const HlTheme *theme, HlLook look, gboolean is_stale);
void            hl_set_look_pen (cairo_t *cr, const HlTheme *theme, HlLook look, gboolean is_stale);

/* Colour and dash of a medium in a state; a second cue beside the colour: line weight, dash. */
void           hl_set_stream_pen (cairo_t *cr, const HlTheme *theme, const HlStreamResult *result, gboolean is_stale);
const HlColour *hl_stream_colour (const HlTheme *theme, const HlStreamResult *result, gboolean is_stale);
G_END_DECLS
