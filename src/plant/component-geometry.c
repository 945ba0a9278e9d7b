/* Where a component's ports and shaft ends lie, with turn and mirror put in.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "plant/component-private.h"

static int
half_width (const HlComponent *component)
{
  const HlKind *kind = component->kind;
  if (kind->widen_option == NULL)
    return kind->half_width;
  return MAX (kind->half_width, (hl_component_option (component, kind->widen_option) + 1) * kind->widen_per);
}

/* Mirrors left-right, then turns clockwise: y runs down, so (x, y) becomes (-y, x). */
static void
place (const HlComponent *component, int x, int y, int *placed_x, int *placed_y)
{
  if (component->is_mirrored)
    x = -x;
  for (int i = 0; i < component->turn; i++)
    {
      int old_x = x;
      x = -y;
      y = old_x;
    }
  *placed_x = component->x + x;
  *placed_y = component->y + y;
}

static HlSide
place_side (const HlComponent *component, HlSide side)
{
  if (component->is_mirrored && side == HL_SIDE_RIGHT)
    side = HL_SIDE_LEFT;
  else if (component->is_mirrored && side == HL_SIDE_LEFT)
    side = HL_SIDE_RIGHT;
  return (HlSide) (((int) side + component->turn) % 4);
}

void
hl_component_half_size (const HlComponent *component, int *width, int *height)
{
  int w, h;
  g_return_if_fail (component != NULL);
  w = half_width (component);
  h = component->kind->half_height;
  if (width != NULL)
    *width = component->turn % 2 == 0 ? w : h;
  if (height != NULL)
    *height = component->turn % 2 == 0 ? h : w;
}

/* Place of a port on the unturned symbol. */
static HlPortPlace
unturned (const HlComponent *component, const HlPort *port)
{
  const HlPortKind *kind = port->kind;
  HlPortPlace at = { kind->x, kind->y, kind->side };
  if (kind->places != NULL && port->number >= 1)
    at = kind->places[port->number - 1];
  else if (port->number >= 1)
    at.x += (port->number - 1) * kind->step_x;
  if (kind->anchor == HL_ANCHOR_LEFT_EDGE)
    at.x -= half_width (component);
  else if (kind->anchor == HL_ANCHOR_RIGHT_EDGE)
    at.x += half_width (component);
  return at;
}

void
hl_component_port_place (const HlComponent *component, guint n, int *x, int *y, HlSide *side)
{
  HlPort port;
  HlPortPlace at;
  int placed_x, placed_y;
  g_return_if_fail (component != NULL);
  port = hl_component_port (component, n);
  g_return_if_fail (port.kind != NULL);
  at = unturned (component, &port);
  place (component, at.x, at.y, &placed_x, &placed_y);
  if (x != NULL)
    *x = placed_x;
  if (y != NULL)
    *y = placed_y;
  if (side != NULL)
    *side = place_side (component, at.side);
}

void
hl_component_shaft_place (const HlComponent *component, int end, int *x, int *y)
{
  g_return_if_fail (component != NULL && x != NULL && y != NULL);
  /* What a shaft drives is flown through from side to side: its shaft comes from below or above. */
  if (component->kind->shaft == HL_SHAFT_DRIVEN)
    place (component, 0, end == 0 ? -component->kind->half_height : component->kind->half_height, x, y);
  else
    place (component, end == 0 ? -half_width (component) : half_width (component), 0, x, y);
}
