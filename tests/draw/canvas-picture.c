/* The picture as a whole against stored ones, and what its parts promise.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "draw/canvas-picture.h"
#include <math.h>
#include <stdlib.h>
#include <string.h>
#include "demo-plants.h"
#include "solution-fixture.h"

/* Stored pictures are made by running this test with HL_STORE_PICTURES set to their folder. */
#define SCALE 0.6

static cairo_surface_t *
draw (HlPlant *plant, HlSolution *solution, HlThemeId id)
{
  HlTheme theme = *hl_theme (id);
  g_autoptr (HlLayout) layout = NULL;
  cairo_surface_t *surface;
  cairo_t *cr;
  HlBox extents;
  theme.font = "DejaVu Sans";
  layout = hl_layout_new (plant, solution, &theme);
  hl_layout_extents (layout, &extents);
  surface = cairo_image_surface_create (CAIRO_FORMAT_RGB24, (int) ceil (extents.width * SCALE), (int) ceil (extents.height * SCALE));
  cr = cairo_create (surface);
  hl_set_colour (cr, &theme.ground);
  cairo_paint (cr);
  cairo_scale (cr, SCALE, SCALE);
  cairo_translate (cr, -extents.x, -extents.y);
  hl_draw_canvas (cr, &theme, layout, plant, solution);
  cairo_destroy (cr);
  return surface;
}

static guint32
pixel_at (cairo_surface_t *surface, int x, int y)
{
  guint32 pixel;
  memcpy (&pixel, cairo_image_surface_get_data (surface) + (gsize) y * cairo_image_surface_get_stride (surface) + (gsize) x * 4, 4);
  return pixel & 0xffffff;
}

static int
difference (guint32 a, guint32 b)
{
  int most = 0;
  for (int shift = 0; shift < 24; shift += 8)
    most = MAX (most, abs ((int) (a >> shift & 0xff) - (int) (b >> shift & 0xff)));
  return most;
}

/* Tolerance: anti-aliasing may move some edge pixels between versions of cairo and the font; a moved line moves far more. */
static void
check_stored (cairo_surface_t *surface, const char *name)
{
  g_autofree char *path = g_test_build_filename (G_TEST_DIST, "draw", "pictures", name, NULL);
  const char *store = g_getenv ("HL_STORE_PICTURES");
  cairo_surface_t *stored;
  int width = cairo_image_surface_get_width (surface), height = cairo_image_surface_get_height (surface), n_other = 0;
  if (store != NULL)
    {
      g_autofree char *target = g_build_filename (store, name, NULL);
      g_assert_cmpint (cairo_surface_write_to_png (surface, target), ==, CAIRO_STATUS_SUCCESS);
    }
  stored = cairo_image_surface_create_from_png (path);
  g_assert_cmpint (cairo_surface_status (stored), ==, CAIRO_STATUS_SUCCESS);
  g_assert_cmpint (abs (cairo_image_surface_get_width (stored) - width), <=, 3);
  g_assert_cmpint (abs (cairo_image_surface_get_height (stored) - height), <=, 3);
  width = MIN (width, cairo_image_surface_get_width (stored));
  height = MIN (height, cairo_image_surface_get_height (stored));
  for (int y = 0; y < height; y++)
    for (int x = 0; x < width; x++)
      n_other += difference (pixel_at (surface, x, y), pixel_at (stored, x, y)) > 64;
  g_test_message ("%s: %d of %d pixels differ", name, n_other, width * height);
  g_assert_cmpfloat ((double) n_other / (width * height), <, 0.004);
  cairo_surface_destroy (stored);
}

static void
test_kinds_look_as_stored (void)
{
  for (int turn = 0; turn < 2; turn++)
    {
      g_autoptr (HlPlant) plant = hl_demo_all_kinds (turn, turn == 1);
      cairo_surface_t *surface = draw (plant, NULL, HL_THEME_PAPER);
      check_stored (surface, turn == 0 ? "kinds.png" : "kinds-turned-mirrored.png");
      cairo_surface_destroy (surface);
    }
}

static void
test_plant_looks_as_stored (void)
{
  g_autoptr (HlPlant) plant = hl_demo_extraction ();
  g_autoptr (HlSolution) solution = hl_fixture_solution (plant, TRUE);
  cairo_surface_t *surface = draw (plant, solution, HL_THEME_DARK);
  check_stored (surface, "extraction-dark.png");
  cairo_surface_destroy (surface);
}

/* Lines and rings of a stale picture are grey: no pixel has the colour of wet steam. */
static void
test_stale_picture_has_no_media_colours (void)
{
  g_autoptr (HlPlant) plant = hl_demo_extraction ();
  const HlTheme *theme = hl_theme (HL_THEME_PAPER);
  /* Amber: the flame and the arrow of heat have the colour of steam. */
  guint32 amber = (guint32) lround (theme->wet.r * 255) << 16 | (guint32) lround (theme->wet.g * 255) << 8 | (guint32) lround (theme->wet.b * 255);
  guint n_found[2] = { 0, 0 };
  for (int is_solved = 0; is_solved < 2; is_solved++)
    {
      g_autoptr (HlSolution) solution = hl_fixture_solution (plant, is_solved);
      cairo_surface_t *surface = draw (plant, solution, HL_THEME_PAPER);
      for (int y = 0; y < cairo_image_surface_get_height (surface); y++)
        for (int x = 0; x < cairo_image_surface_get_width (surface); x++)
          n_found[is_solved] += difference (pixel_at (surface, x, y), amber) < 4;
      cairo_surface_destroy (surface);
    }
  g_assert_cmpuint (n_found[0], ==, 0);
  g_assert_cmpuint (n_found[1], >, 50);
}

/* What is drawn around @box, up to 40 pixels off, on a clear ground. */
static void
check_margin_is_clear (const HlStreamPlace *place, const HlStream *stream, gboolean is_label, const HlBox *box)
{
  const int margin = 40, left = (int) floor (box->x) - margin, top = (int) floor (box->y) - margin;
  cairo_surface_t *surface = cairo_image_surface_create (CAIRO_FORMAT_RGB24, (int) box->width + 2 * margin, (int) box->height + 2 * margin);
  cairo_t *cr = cairo_create (surface);
  cairo_translate (cr, -left, -top);
  if (is_label)
    hl_draw_stream_label (cr, hl_theme (HL_THEME_PAPER), place, stream, NULL, FALSE, TRUE);
  else
    hl_draw_stream_line (cr, hl_theme (HL_THEME_PAPER), place, NULL, FALSE, TRUE);
  cairo_destroy (cr);
  cairo_surface_flush (surface);
  for (int y = 0; y < cairo_image_surface_get_height (surface); y++)
    for (int x = 0; x < cairo_image_surface_get_width (surface); x++)
      if (pixel_at (surface, x, y) != 0)
        {
          g_assert_cmpfloat (left + x + 1.0, >=, box->x);
          g_assert_cmpfloat (top + y + 1.0, >=, box->y);
          g_assert_cmpfloat (left + x, <=, box->x + box->width);
          g_assert_cmpfloat (top + y, <=, box->y + box->height);
        }
  cairo_surface_destroy (surface);
}

/* What is drawn stays inside the bounds that the window repaints. */
static void
test_parts_stay_inside_their_bounds (void)
{
  g_autoptr (HlPlant) plant = hl_demo_heater_row (6);
  g_autoptr (HlSolution) solution = hl_fixture_solution (plant, TRUE);
  g_autoptr (HlLayout) layout = hl_layout_new (plant, solution, hl_theme (HL_THEME_PAPER));
  guint n_leaders = 0;
  for (guint i = 0; i < hl_plant_n_streams (plant); i++)
    {
      const HlStreamPlace *place = hl_layout_stream (layout, i);
      const HlStream *stream = hl_plant_stream (plant, i);
      HlBox box;
      hl_stream_line_bounds (place, &box);
      check_margin_is_clear (place, stream, FALSE, &box);
      hl_stream_label_bounds (place, &box);
      check_margin_is_clear (place, stream, TRUE, &box);
      n_leaders += place->has_leader;
    }
  g_assert_cmpuint (n_leaders, >, 0);
}

int
main (int argc, char **argv)
{
  g_test_init (&argc, &argv, NULL);
  g_test_add_func ("/draw/canvas-picture/kinds-look-as-stored", test_kinds_look_as_stored);
  g_test_add_func ("/draw/canvas-picture/plant-looks-as-stored", test_plant_looks_as_stored);
  g_test_add_func ("/draw/canvas-picture/stale-picture-has-no-media-colours", test_stale_picture_has_no_media_colours);
  g_test_add_func ("/draw/canvas-picture/parts-stay-inside-their-bounds", test_parts_stay_inside_their_bounds);
  return g_test_run ();
}
