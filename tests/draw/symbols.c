/* Every kind draws inside its box, meets its ports, and keeps its letters upright.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "draw/symbols.h"
#include <math.h>
#include <string.h>

#define SIDE  280       /* pixels of the square pictures, origin in the middle */
#define STROKE 2.0      /* how far a stroke reaches over the box */

typedef struct { cairo_surface_t *surface; const guint8 *data; int stride; } Picture;

static Picture
begin (cairo_t **cr)
{
  Picture picture = { .surface = cairo_image_surface_create (CAIRO_FORMAT_ARGB32, SIDE, SIDE) };
  *cr = cairo_create (picture.surface);
  cairo_translate (*cr, SIDE / 2.0, SIDE / 2.0);
  return picture;
}

static void
end (Picture *picture, cairo_t *cr)
{
  cairo_destroy (cr);
  cairo_surface_flush (picture->surface);
  picture->data = cairo_image_surface_get_data (picture->surface);
  picture->stride = cairo_image_surface_get_stride (picture->surface);
}

static Picture
picture_of (const HlComponent *component)
{
  cairo_t *cr;
  Picture picture = begin (&cr);
  hl_draw_symbol (cr, hl_theme (HL_THEME_PAPER), component);
  end (&picture, cr);
  return picture;
}

/* Opacity at a point around the origin. */
static int
opacity (const Picture *picture, int x, int y)
{
  guint32 pixel;
  x += SIDE / 2;
  y += SIDE / 2;
  if (x < 0 || y < 0 || x >= SIDE || y >= SIDE)
    return 0;
  memcpy (&pixel, picture->data + y * picture->stride + x * 4, 4);
  return pixel >> 24;
}

static gboolean
is_drawn_near (const Picture *picture, double x, double y, int within)
{
  for (int dy = -within; dy <= within; dy++)
    for (int dx = -within; dx <= within; dx++)
      if (opacity (picture, (int) lround (x) + dx, (int) lround (y) + dy) > 100)
        return TRUE;
  return FALSE;
}

static void
check_inside (const Picture *picture, double half_width, double half_height)
{
  int n_inside = 0;
  for (int y = -SIDE / 2; y < SIDE / 2; y++)
    for (int x = -SIDE / 2; x < SIDE / 2; x++)
      if (opacity (picture, x, y) > 8)
        {
          g_assert_cmpfloat (fabs (x + 0.5), <=, half_width + STROKE);
          g_assert_cmpfloat (fabs (y + 0.5), <=, half_height + STROKE);
          n_inside++;
        }
  g_assert_cmpint (n_inside, >, 20);
}

static void
check_ports (const Picture *picture, const HlComponent *component)
{
  static const int out_x[4] = { 1, 0, -1, 0 }, out_y[4] = { 0, 1, 0, -1 };
  for (guint n = 0; n < hl_component_n_ports (component); n++)
    {
      double lead = hl_symbol_lead (component, n), x, y;
      HlSide side;
      int port_x, port_y;
      hl_component_port_place (component, n, &port_x, &port_y, &side);
      x = (port_x - component->x) * HL_UNIT;
      y = (port_y - component->y) * HL_UNIT;
      g_test_message ("%s.%s turn %d mirror %d", component->kind->id, hl_component_port (component, n).key, component->turn, component->is_mirrored);
      g_assert_cmpfloat (lead, >=, 0.0);
      g_assert_true (is_drawn_near (picture, x - out_x[side] * lead, y - out_y[side] * lead, 2));
      /* Between port and outline lies nothing: the line has that room to itself. */
      for (double k = 2.0; k < lead - 2.5; k += 1.0)
        g_assert_cmpint (opacity (picture, (int) floor (x - out_x[side] * k), (int) floor (y - out_y[side] * k)), <, 100);
    }
}

static void
check_component (const HlComponent *component)
{
  Picture picture = picture_of (component);
  int w, h;
  hl_component_half_size (component, &w, &h);
  check_inside (&picture, w * HL_UNIT, h * HL_UNIT);
  check_ports (&picture, component);
  cairo_surface_destroy (picture.surface);
}

static void
for_all_placements (const HlKind *kind, const char *option, int value)
{
  for (int turn = 0; turn < 4; turn++)
    for (int mirror = 0; mirror < 2; mirror++)
      {
        HlComponent *component = hl_component_new (kind, "K1", 3, -2);
        if (option != NULL)
          hl_component_set_option (component, option, value);
        component->turn = turn;
        component->is_mirrored = mirror;
        check_component (component);
        hl_component_unref (component);
      }
}

static void
test_every_kind_fills_its_box_and_meets_its_ports (void)
{
  g_assert_cmpuint (hl_kind_count (), >=, 15);
  for (guint i = 0; i < hl_kind_count (); i++)
    {
      const HlKind *kind = hl_kind_nth (i);
      for_all_placements (kind, NULL, 0);
      for (guint k = 0; k < kind->n_options; k++)
        for (int value = kind->options[k].least; value <= kind->options[k].most; value++)
          for_all_placements (kind, kind->options[k].key, value);
    }
}

/* The generator's circle, letter and wave look the same however it is turned. */
static void
test_letters_stay_upright (void)
{
  const HlKind *kind = hl_kind_lookup ("generator");
  HlComponent *straight = hl_component_new (kind, "G1", 0, 0);
  Picture first = picture_of (straight);
  for (int turn = 0; turn < 4; turn++)
    for (int mirror = 0; mirror < 2; mirror++)
      {
        HlComponent *component = hl_component_new (kind, "G1", 0, 0);
        Picture other;
        long difference = 0;
        component->turn = turn;
        component->is_mirrored = mirror;
        other = picture_of (component);
        for (int i = 0; i < SIDE * first.stride; i++)
          difference += abs (first.data[i] - other.data[i]);
        g_assert_cmpfloat ((double) difference / (SIDE * first.stride), <, 0.05);   /* levels; rounding at the edges */
        cairo_surface_destroy (other.surface);
        hl_component_unref (component);
      }
  cairo_surface_destroy (first.surface);
  hl_component_unref (straight);
}

static void
test_shelf_pictures_fit_their_size (void)
{
  static const double sizes[] = { 16.0, 24.0, 36.0, 96.0 };
  for (guint i = 0; i < hl_kind_count (); i++)
    for (guint k = 0; k < G_N_ELEMENTS (sizes); k++)
      {
        cairo_t *cr;
        Picture picture = begin (&cr);
        hl_draw_kind (cr, hl_theme (HL_THEME_DARK), hl_kind_nth (i), sizes[k]);
        end (&picture, cr);
        check_inside (&picture, sizes[k] / 2.0 - STROKE, sizes[k] / 2.0 - STROKE);
        cairo_surface_destroy (picture.surface);
      }
}

static void
test_kind_without_symbol_is_a_named_box (void)
{
  HlKind kind = *hl_kind_lookup ("condenser");
  HlComponent *component;
  kind.id = "not_drawn_yet";
  kind.name = "A kind with quite a long name";
  component = hl_component_new_bare (&kind, "Z1", 0, 0);
  check_component (component);
  hl_component_unref (component);
}

int
main (int argc, char **argv)
{
  g_test_init (&argc, &argv, NULL);
  g_test_add_func ("/draw/symbols/every-kind-fills-its-box-and-meets-its-ports", test_every_kind_fills_its_box_and_meets_its_ports);
  g_test_add_func ("/draw/symbols/letters-stay-upright", test_letters_stay_upright);
  g_test_add_func ("/draw/symbols/shelf-pictures-fit-their-size", test_shelf_pictures_fit_their_size);
  g_test_add_func ("/draw/symbols/kind-without-symbol-is-a-named-box", test_kind_without_symbol_is_a_named_box);
  return g_test_run ();
}
