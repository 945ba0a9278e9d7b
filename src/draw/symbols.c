/* The table of symbols, and how one is turned, mirrored and scaled.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "draw/symbols.h"
#include "draw/symbols/symbol-private.h"
#include "draw/text.h"
#include "plant/i18n.h"

static const HlSymbol *const symbols[] = {
  &hl_symbol_heat_input, &hl_symbol_boiler, &hl_symbol_turbine, &hl_symbol_generator, &hl_symbol_condenser, &hl_symbol_pump,
  &hl_symbol_pipe, &hl_symbol_valve, &hl_symbol_open_heater, &hl_symbol_closed_heater, &hl_symbol_splitter, &hl_symbol_mixer,
  &hl_symbol_steam_user, &hl_symbol_make_up, &hl_symbol_boundary, &hl_symbol_motor, &hl_symbol_gearbox, &hl_symbol_compressor, &hl_symbol_desuperheater, &hl_symbol_moisture_separator, &hl_symbol_flash_vessel, &hl_symbol_cooling_tower, &hl_symbol_air_condenser, &hl_symbol_district_heater, &hl_symbol_recuperator, &hl_symbol_exchanger,
  &hl_symbol_feed_pump_turbine, &hl_symbol_ejector, &hl_symbol_gland_seal, &hl_symbol_control_stage, &hl_symbol_hotwell,
  &hl_symbol_header, &hl_symbol_bypass_station, &hl_symbol_drain_pump,
  &hl_symbol_expander, &hl_symbol_evaporator, &hl_symbol_expansion_valve,
  &hl_symbol_economiser, &hl_symbol_evaporator_drum, &hl_symbol_superheater, &hl_symbol_reheater, &hl_symbol_air_preheater, &hl_symbol_steam_air_heater,
  &hl_symbol_flue_gas_condenser, &hl_symbol_gas_source, &hl_symbol_stack, &hl_symbol_fan, &hl_symbol_solar_field,
};

static const HlSymbol *
find_symbol (const HlKind *kind)
{
  for (guint i = 0; i < G_N_ELEMENTS (symbols); i++)
    if (g_str_equal (symbols[i]->kind, kind->id))
      return symbols[i];
  return NULL;
}

/* A kind without a symbol of its own: a box that says what it is. */
static void
draw_named_box (const HlPen *pen)
{
  const char *name = _(pen->component->kind->name);
  double room = 2.0 * pen->half_width - 8.0, size = 10.0;
  double width = hl_text_width (pen->theme, name, size, FALSE);
  hl_pen_box (pen, -pen->half_width / U, -pen->half_height / U, 2.0 * pen->half_width / U, 2.0 * pen->half_height / U, 0.25);
  hl_pen_body (pen);
  if (width > room)
    size *= room / width;
  hl_pen_letters (pen, name, 0.0, 0.0, size, FALSE);
}

static void
set_unturned_size (HlPen *pen, const HlComponent *component)
{
  int width, height;
  hl_component_half_size (component, &width, &height);
  pen->half_width = (component->turn % 2 == 0 ? width : height) * U;
  pen->half_height = (component->turn % 2 == 0 ? height : width) * U;
}

static void
draw (HlPen *pen, const HlComponent *component)
{
  const HlSymbol *symbol = find_symbol (component->kind);
  pen->component = component;
  set_unturned_size (pen, component);
  cairo_save (pen->cr);
  cairo_rotate (pen->cr, component->turn * G_PI_2);
  if (component->is_mirrored)
    cairo_scale (pen->cr, -1.0, 1.0);
  cairo_set_line_join (pen->cr, CAIRO_LINE_JOIN_ROUND);
  cairo_set_line_cap (pen->cr, CAIRO_LINE_CAP_ROUND);
  cairo_set_dash (pen->cr, NULL, 0, 0.0);
  cairo_new_path (pen->cr);
  if (symbol != NULL)
    symbol->draw (pen);
  else
    draw_named_box (pen);
  cairo_restore (pen->cr);
}

void
hl_draw_symbol (cairo_t *cr, const HlTheme *theme, const HlComponent *component)
{
  HlPen pen = { .cr = cr, .theme = theme, .stroke = 2.0 };
  draw (&pen, component);
}

void
hl_draw_kind (cairo_t *cr, const HlTheme *theme, const HlKind *kind, double size)
{
  HlComponent *component = hl_component_new_bare (kind, "", 0, 0);
  HlPen pen = { .cr = cr, .theme = theme, .is_icon = TRUE };
  double scale, largest;
  set_unturned_size (&pen, component);
  largest = MAX (MAX (pen.half_width, pen.half_height), 1.6 * U);
  scale = (size - 3.0) / (2.0 * largest);
  /* Outlines keep nearly their weight in pixels when the symbol shrinks. */
  pen.stroke = 1.7 / scale;
  cairo_save (cr);
  cairo_scale (cr, scale, scale);
  draw (&pen, component);
  cairo_restore (cr);
  hl_component_unref (component);
}

double
hl_symbol_lead (const HlComponent *component, guint port)
{
  const HlSymbol *symbol = find_symbol (component->kind);
  HlPen pen = { .cr = NULL };
  HlSide side;
  int x, y;
  if (symbol == NULL || symbol->lead == NULL)
    return 0.0;
  set_unturned_size (&pen, component);
  hl_component_port_place (component, port, &x, &y, &side);
  x -= component->x;
  y -= component->y;
  for (int i = 0; i < component->turn; i++)   /* a quarter turn anticlockwise */
    {
      int old_x = x;
      x = y;
      y = -old_x;
    }
  side = (side + 4 - component->turn) % 4;
  if (component->is_mirrored)
    {
      x = -x;
      if (side == HL_SIDE_LEFT || side == HL_SIDE_RIGHT)
        side = side == HL_SIDE_LEFT ? HL_SIDE_RIGHT : HL_SIDE_LEFT;
    }
  return symbol->lead (component, x * U, y * U, side, pen.half_width);
}
