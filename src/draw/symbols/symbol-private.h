/* What the symbols share: a pen in the symbol's own coordinates, and the row each kind has in the table.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#pragma once
#include "draw/symbols.h"
G_BEGIN_DECLS

#define U HL_UNIT

/* The cairo context is turned and mirrored already: a symbol draws itself upright, x right, y down. */
typedef struct {
  cairo_t           *cr;
  const HlTheme     *theme;
  const HlComponent *component;
  double             half_width, half_height;   /* of the unturned box [pixels] */
  double             stroke;                    /* weight of outlines [user units] */
  gboolean           is_icon;                   /* on the shelf: no lines arrive there, so stubs show the ports */
} HlPen;

typedef struct {
  const char *kind;
  void      (*draw) (const HlPen *pen);
  /* Pixels from the port at (@x, @y), unturned pixels, inwards to the outline; 0 where the port lies on it. */
  double    (*lead) (const HlComponent *component, double x, double y, HlSide side, double half_width);
} HlSymbol;

extern const HlSymbol hl_symbol_heat_input, hl_symbol_boiler, hl_symbol_turbine, hl_symbol_generator, hl_symbol_condenser,
  hl_symbol_pump, hl_symbol_pipe, hl_symbol_valve, hl_symbol_open_heater, hl_symbol_closed_heater, hl_symbol_splitter,
  hl_symbol_mixer, hl_symbol_steam_user, hl_symbol_make_up, hl_symbol_boundary, hl_symbol_exchanger, hl_symbol_recuperator,
  hl_symbol_district_heater, hl_symbol_air_condenser, hl_symbol_cooling_tower, hl_symbol_flash_vessel,
  hl_symbol_moisture_separator, hl_symbol_desuperheater, hl_symbol_compressor, hl_symbol_gearbox, hl_symbol_motor,
  hl_symbol_feed_pump_turbine, hl_symbol_ejector, hl_symbol_gland_seal, hl_symbol_control_stage, hl_symbol_hotwell,
  hl_symbol_header, hl_symbol_bypass_station, hl_symbol_drain_pump,
  hl_symbol_expander, hl_symbol_evaporator, hl_symbol_expansion_valve,
  hl_symbol_economiser, hl_symbol_evaporator_drum, hl_symbol_superheater, hl_symbol_reheater, hl_symbol_air_preheater, hl_symbol_steam_air_heater,
  hl_symbol_flue_gas_condenser, hl_symbol_gas_source, hl_symbol_stack, hl_symbol_fan, hl_symbol_solar_field;

void hl_pen_body    (const HlPen *pen);                                             /* fills the path with the card, strokes it with ink */
void hl_pen_stroke  (const HlPen *pen, const HlColour *colour, double weight);      /* strokes the path; @weight relative to outlines */
void hl_pen_path    (const HlPen *pen, const double (*points)[2], guint n_points);  /* polyline in grid units */
void hl_pen_box     (const HlPen *pen, double x, double y, double width, double height, double radius);   /* path, grid units */
void hl_pen_circle  (const HlPen *pen, double x, double y, double radius);          /* path, grid units */
void hl_pen_go_upright (const HlPen *pen, double x, double y);   /* origin there [grid units], turn and mirror taken back; save and restore around it */
void hl_pen_letters (const HlPen *pen, const char *text, double x, double y, double size, gboolean is_bold);  /* centred, upright; grid units, pixels */
void hl_pen_arrow_head (const HlPen *pen, double x, double y, double dx, double dy, double length, const HlColour *colour);   /* tip; unit direction */
void hl_pen_coil    (const HlPen *pen, double x, double y_from, double y_to, double amplitude, guint n);  /* path: zigzag across a vertical axis */

/* Shared by boiler and heat input. */
void   hl_symbol_draw_furnace (const HlPen *pen, void (*draw_source) (const HlPen *pen));
double hl_symbol_furnace_lead (const HlComponent *component, double x, double y, HlSide side, double half_width);
G_END_DECLS
