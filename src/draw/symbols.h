/* Symbols of the kinds: the same drawing at shelf, canvas, nameplate and paper size.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#pragma once
#include "draw/theme.h"
G_BEGIN_DECLS

#define HL_UNIT 10.0    /* pixels of a grid unit at zoom 1 */

/* Draws around the origin, in pixels at zoom 1, with turn and mirror put in (letters stay upright). */
void hl_draw_symbol      (cairo_t *cr, const HlTheme *theme, const HlComponent *component);
/* A kind with its usual options, scaled into a box of @size pixels around the origin: for shelf and nameplate. */
void hl_draw_kind        (cairo_t *cr, const HlTheme *theme, const HlKind *kind, double size);
/* Pixels from a port inwards to the symbol's outline: a line is drawn on that far beneath the symbol. */
double hl_symbol_lead    (const HlComponent *component, guint port);
G_END_DECLS
