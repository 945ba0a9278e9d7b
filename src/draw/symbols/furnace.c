/* The heated box that boiler and heat input share: coils above, the source of heat below.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "draw/symbols/symbol-private.h"

#define HALF_WIDTH 2.4
#define HALF_HEIGHT 3.0

/* @side_sign: 1 the right wall, -1 the left one. */
static void
draw_reheater (const HlPen *pen, double side_sign)
{
  const double s = side_sign;
  const double coil[][2] = {
    { s * HALF_WIDTH, 1.0 }, { s * 1.95, 1.0 }, { s * 1.25, 0.6 }, { s * 1.95, 0.2 }, { s * 1.25, -0.2 },
    { s * 1.95, -0.6 }, { s * 1.55, -1.0 }, { s * HALF_WIDTH, -1.0 },
  };
  hl_pen_path (pen, coil, G_N_ELEMENTS (coil));
  hl_pen_stroke (pen, &pen->theme->ink, 0.75);
}

static void
draw_main_coil (const HlPen *pen, int n_reheats)
{
  const double centre = n_reheats == 1 ? -0.55 : 0.0;
  const double amplitude = n_reheats == 0 ? 1.45 : n_reheats == 1 ? 1.15 : 0.75;
  const double left = centre - amplitude, right = centre + amplitude;
  const double coil[][2] = {
    { 0.0, -HALF_HEIGHT }, { 0.0, -2.35 }, { right, -1.85 }, { left, -1.3 }, { right, -0.75 }, { left, -0.2 },
    { left, 2.35 }, { 0.0, 2.35 }, { 0.0, HALF_HEIGHT },
  };
  hl_pen_path (pen, coil, G_N_ELEMENTS (coil));
  hl_pen_stroke (pen, &pen->theme->ink, 0.85);
}

void
hl_symbol_draw_furnace (const HlPen *pen, void (*draw_source) (const HlPen *pen))
{
  int n_reheats = hl_component_option (pen->component, "reheats");
  hl_pen_box (pen, -HALF_WIDTH, -HALF_HEIGHT, 2 * HALF_WIDTH, 2 * HALF_HEIGHT, 0.25);
  hl_pen_body (pen);
  draw_main_coil (pen, n_reheats);
  if (hl_component_option (pen->component, "blowdown") != 0)
    {
      static const double blowdown[][2] = { { -HALF_WIDTH, 2.0 }, { -0.95, 2.0 } };
      hl_pen_path (pen, blowdown, G_N_ELEMENTS (blowdown));
      hl_pen_stroke (pen, &pen->theme->ink, 0.5);
    }
  if (n_reheats >= 1)
    draw_reheater (pen, 1.0);
  if (n_reheats >= 2)
    draw_reheater (pen, -1.0);
  draw_source (pen);
}

double
hl_symbol_furnace_lead (const HlComponent *component, double x, double y, HlSide side, double half_width)
{
  (void) component; (void) x; (void) y;
  return side == HL_SIDE_LEFT || side == HL_SIDE_RIGHT ? half_width - HALF_WIDTH * U : 0.0;
}
