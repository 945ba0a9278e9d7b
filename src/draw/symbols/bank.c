/* Heating surfaces on a gas path: a piece of duct, open where the gas comes and goes, with its coil.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "draw/symbols/symbol-private.h"

/* The duct: walls above and below, thin where the gas passes. */
static void
draw_duct (const HlPen *pen, double top, double bottom)
{
  const double upper[][2] = { { -2.0, top }, { 2.0, top } }, lower[][2] = { { -2.0, bottom }, { 2.0, bottom } };
  hl_pen_box (pen, -2.0, top, 4.0, bottom - top, 0.0);
  hl_set_colour (pen->cr, &pen->theme->card);
  cairo_fill (pen->cr);
  hl_pen_path (pen, upper, 2);
  hl_pen_stroke (pen, &pen->theme->ink, 1.0);
  hl_pen_path (pen, lower, 2);
  hl_pen_stroke (pen, &pen->theme->ink, 1.0);
  for (int k = -1; k <= 1; k += 2)
    {
      const double open[][2] = { { 2.0 * k, top }, { 2.0 * k, bottom } };
      hl_pen_path (pen, open, 2);
      hl_pen_stroke (pen, &pen->theme->gas, 0.5);
    }
}

/* From below to above through @n bends. */
static void
draw_coil (const HlPen *pen, double top, double bottom, double amplitude, guint n, const HlColour *colour)
{
  const double below[][2] = { { 0.0, bottom }, { 0.0, bottom - 0.4 } }, above[][2] = { { 0.0, top + 0.4 }, { 0.0, top } };
  hl_pen_path (pen, below, 2);
  hl_pen_stroke (pen, colour, 0.85);
  hl_pen_coil (pen, 0.0, top + 0.4, bottom - 0.4, amplitude, n);
  hl_pen_stroke (pen, colour, 0.85);
  hl_pen_path (pen, above, 2);
  hl_pen_stroke (pen, colour, 0.85);
}

static void
draw_economiser (const HlPen *pen)
{
  draw_duct (pen, -1.6, 1.6);
  draw_coil (pen, -2.0, 2.0, 1.1, 5, &pen->theme->water);
}

static void
draw_superheater (const HlPen *pen)
{
  draw_duct (pen, -1.6, 1.6);
  draw_coil (pen, -2.0, 2.0, 1.1, 3, &pen->theme->steam);
}

/* Twice: steam that has been here before. */
static void
draw_reheater (const HlPen *pen)
{
  draw_superheater (pen);
  hl_pen_coil (pen, 0.55, -1.2, 1.2, 0.8, 3);
  hl_pen_stroke (pen, &pen->theme->steam, 0.5);
}

static void
draw_air_preheater (const HlPen *pen)
{
  draw_duct (pen, -1.6, 1.6);
  for (int k = -1; k <= 1; k++)
    {
      const double tube[][2] = { { 0.9 * k, 1.6 }, { 0.9 * k, -1.6 } };
      hl_pen_path (pen, tube, 2);
      hl_pen_stroke (pen, &pen->theme->ink, 0.7);
    }
  static const double below[][2] = { { -0.9, 1.6 }, { 0.9, 1.6 } }, in[][2] = { { 0.0, 2.0 }, { 0.0, 1.6 } }, out[][2] = { { 0.0, -1.6 }, { 0.0, -2.0 } };
  hl_pen_path (pen, below, 2);
  hl_pen_stroke (pen, &pen->theme->ink, 0.7);
  hl_pen_path (pen, in, 2);
  hl_pen_stroke (pen, &pen->theme->ink, 0.7);
  hl_pen_path (pen, out, 2);
  hl_pen_stroke (pen, &pen->theme->ink, 0.7);
}

/* A coil of steam across the duct of the air. */
static void
draw_steam_air_heater (const HlPen *pen)
{
  draw_duct (pen, -1.6, 1.6);
  draw_coil (pen, -2.0, 2.0, 0.8, 3, &pen->theme->wet);
}

/* Drops fall from the coil. */
static void
draw_flue_gas_condenser (const HlPen *pen)
{
  draw_duct (pen, -1.6, 1.6);
  draw_coil (pen, -2.0, 2.0, 1.1, 5, &pen->theme->water);
  for (int k = -1; k <= 1; k += 2)
    {
      hl_pen_circle (pen, 1.5 * k, 1.0, 0.22);
      hl_pen_stroke (pen, &pen->theme->water, 0.6);
    }
}

/* The drum lies above the duct; two pipes down, two up. */
static void
draw_evaporator (const HlPen *pen)
{
  static const double level[][2] = { { -1.1, -2.0 }, { 1.1, -2.0 } };
  static const double down[][2] = { { -0.9, -1.4 }, { -0.9, 2.2 }, { 0.0, 2.2 } };
  draw_duct (pen, -0.6, 2.6);
  hl_pen_path (pen, down, G_N_ELEMENTS (down));
  hl_pen_stroke (pen, &pen->theme->water, 0.7);
  hl_pen_coil (pen, 0.4, -1.2, 2.2, 0.7, 4);
  hl_pen_stroke (pen, &pen->theme->wet, 0.85);
  hl_pen_box (pen, -1.5, -2.6, 3.0, 1.3, 0.65);
  hl_pen_body (pen);
  hl_pen_path (pen, level, 2);
  hl_pen_stroke (pen, &pen->theme->water, 0.5);
  static const double steam[][2] = { { 0.0, -2.6 }, { 0.0, -3.0 } };
  hl_pen_path (pen, steam, 2);
  hl_pen_stroke (pen, &pen->theme->ink, 0.85);
}

/* Feed and blowdown reach the drum, the gas the duct. */
static double
evaporator_lead (const HlComponent *component, double x, double y, HlSide side, double half_width)
{
  (void) component; (void) x;
  return (side == HL_SIDE_LEFT || side == HL_SIDE_RIGHT) && y < 0.0 ? half_width - 1.5 * U : 0.0;
}

const HlSymbol hl_symbol_economiser = { "economiser", draw_economiser, NULL };
const HlSymbol hl_symbol_superheater = { "superheater", draw_superheater, NULL };
const HlSymbol hl_symbol_reheater = { "reheater", draw_reheater, NULL };
const HlSymbol hl_symbol_air_preheater = { "air_preheater", draw_air_preheater, NULL };
const HlSymbol hl_symbol_steam_air_heater = { "steam_air_heater", draw_steam_air_heater, NULL };
const HlSymbol hl_symbol_flue_gas_condenser = { "flue_gas_condenser", draw_flue_gas_condenser, NULL };
const HlSymbol hl_symbol_evaporator_drum = { "evaporator_drum", draw_evaporator, evaporator_lead };
