/* Bands: what comes in goes out, to rounding; every width is to scale; words stand clear.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "../engine/plants.h"
#include "draw/bands-private.h"
#include "draw/plot-labels.h"
#include <math.h>
#include <string.h>

static const struct { double width, height; } sizes[] = { { 400, 300 }, { 700, 300 }, { 960, 600 }, { 1280, 420 }, { 1600, 1000 } };

#define N_PLANTS 4

static HlSolution *
solution_of (guint n)
{
  const char *const texts[N_PLANTS] = { test_simple_loop, test_reheat_plant, test_large_plant, test_industrial_plant };
  HlPlant *plant = test_plant (texts[n]);
  HlSolution *solution;
  if (n == 3)
    plant = test_plant_set (plant, "U1.heat", 8e6);
  solution = hl_solve (plant, NULL);
  hl_plant_unref (plant);
  test_assert_solved (solution);
  return solution;
}

static double
value_or_zero (const HlSolution *solution, const char *address)
{
  double value = test_value (solution, address);
  return isfinite (value) ? value : 0.0;
}

static void
test_energy_balances (void)
{
  for (guint n = 0; n < N_PLANTS; n++)
    {
      g_autoptr (HlSolution) solution = solution_of (n);
      g_autoptr (HlBands) bands = hl_bands_new (solution);
      double in = 0.0, out = 0.0;
      g_assert_true (bands->is_complete);
      for (guint i = 0; i < bands->bands->len; i++)
        {
          const HlBand *band = &g_array_index (bands->bands, HlBand, i);
          g_assert_cmpint (band->kind, !=, HL_BAND_REST);
          g_assert_cmpfloat (band->power, >, 0.0);
          if (band->kind == HL_BAND_FUEL || band->kind == HL_BAND_HEAT || band->kind == HL_BAND_WATER_IN)
            in += band->power;
          else if (band->kind != HL_BAND_PUMPS)
            out += band->power;
        }
      g_assert_cmpfloat (in, >, 0.0);
      test_assert_near (out, in, 1e-6);
    }
}

/* Each band is the quantity that the plant itself states. */
static void
test_bands_are_the_plants_results (void)
{
  for (guint n = 0; n < N_PLANTS; n++)
    {
      g_autoptr (HlSolution) solution = solution_of (n);
      g_autoptr (HlBands) bands = hl_bands_new (solution);
      test_assert_near (hl_bands_sum (bands, HL_BAND_NET), test_value (solution, "plant.net_power"), 1e-9);
      test_assert_near (hl_bands_sum (bands, HL_BAND_REJECTED), test_value (solution, "plant.heat_rejected"), 1e-9);
      test_assert_near (hl_bands_sum (bands, HL_BAND_FUEL), value_or_zero (solution, "plant.fuel_heat"), 1e-9);
      test_assert_near (hl_bands_sum (bands, HL_BAND_DELIVERED), value_or_zero (solution, "plant.heat_delivered"), 1e-9);
      test_assert_near (hl_bands_sum (bands, HL_BAND_FUEL) - hl_bands_sum (bands, HL_BAND_FIRING_LOSS) + hl_bands_sum (bands, HL_BAND_HEAT),
                        test_value (solution, "plant.heat_input"), 1e-9);
    }
}

static const HlStrip *
strip (const HlBandsPicture *picture, guint n)
{
  return &g_array_index (picture->strips, HlStrip, n);
}

/* After all have left, the main band is as wide as the net power; and every strip is as wide as its power. */
static void
test_widths_are_to_scale (void)
{
  for (guint n = 0; n < N_PLANTS; n++)
    {
      g_autoptr (HlSolution) solution = solution_of (n);
      g_autoptr (HlBandsPicture) picture = hl_bands_picture_new (solution, HL_UNITS_METRIC, 960.0, 600.0);
      double top, bottom, last = 0.0;
      hl_bands_picture_edges (picture, picture->right, &top, &bottom);
      g_assert_cmpfloat_with_epsilon (bottom - top, hl_bands_sum (picture->bands, HL_BAND_NET) * picture->scale, 1e-3);
      for (guint i = 0; i < picture->strips->len; i++)
        {
          g_assert_cmpfloat_with_epsilon (strip (picture, i)->width, strip (picture, i)->power * picture->scale, 1e-9);
          if (strip (picture, i)->way != HL_STRIP_DOWN && strip (picture, i)->way != HL_STRIP_UP)
            continue;
          /* One after the other, and none reaches into the next. */
          g_assert_cmpfloat (strip (picture, i)->x, >=, last);
          last = strip (picture, i)->x + picture->radius + strip (picture, i)->width;
          g_assert_cmpfloat (last, <=, picture->right);
        }
    }
}

static void
assert_nothing_is_clipped (const HlBandsPicture *picture, HlThemeId theme)
{
  cairo_surface_t *surface = cairo_recording_surface_create (CAIRO_CONTENT_COLOR_ALPHA, NULL);
  cairo_t *cr = cairo_create (surface);
  double x, y, width, height;
  hl_bands_picture_draw (picture, cr, hl_theme (theme), FALSE);
  g_assert_cmpint (cairo_status (cr), ==, CAIRO_STATUS_SUCCESS);
  cairo_recording_surface_ink_extents (surface, &x, &y, &width, &height);
  g_assert_cmpfloat (x, >=, 0.0);
  g_assert_cmpfloat (y, >=, 0.0);
  g_assert_cmpfloat (x + width, <=, picture->width);
  g_assert_cmpfloat (y + height, <=, picture->height);
  cairo_destroy (cr);
  cairo_surface_destroy (surface);
}

static void
test_words_stand_clear (void)
{
  for (guint n = 0; n < N_PLANTS; n++)
    {
      g_autoptr (HlSolution) solution = solution_of (n);
      for (guint i = 0; i < G_N_ELEMENTS (sizes); i++)
        for (int units = 0; units < HL_N_UNIT_SETS; units++)
          {
            g_autoptr (HlBandsPicture) picture = hl_bands_picture_new (solution, (HlUnitSet) units, sizes[i].width, sizes[i].height);
            for (guint a = 0; a < picture->strips->len; a++)
              {
                const HlBox *box = &strip (picture, a)->label;
                g_assert_true (box->x >= 0.0 && box->y >= 0.0 && box->x + box->width <= picture->width && box->y + box->height <= picture->height);
                for (guint b = a + 1; b < picture->strips->len; b++)
                  g_assert_false (hl_box_overlaps (box, &strip (picture, b)->label));
              }
            assert_nothing_is_clipped (picture, HL_THEME_DARK);
            assert_nothing_is_clipped (picture, HL_THEME_PAPER);
          }
    }
}

static void
test_without_balance_it_says_so (void)
{
  g_autoptr (HlPlant) plant = hl_plant_new ();
  g_autoptr (HlSolution) solution = hl_solve (plant, NULL);
  g_autoptr (HlBandsPicture) picture = hl_bands_picture_new (solution, HL_UNITS_METRIC, 400.0, 300.0);
  g_assert_false (picture->bands->is_complete);
  g_assert_cmpuint (picture->strips->len, ==, 0);
  assert_nothing_is_clipped (picture, HL_THEME_LIGHT);
}

int
main (int argc, char **argv)
{
  g_test_init (&argc, &argv, NULL);
  g_test_add_func ("/draw/bands/energy-balances", test_energy_balances);
  g_test_add_func ("/draw/bands/bands-are-the-plants-results", test_bands_are_the_plants_results);
  g_test_add_func ("/draw/bands/widths-are-to-scale", test_widths_are_to_scale);
  g_test_add_func ("/draw/bands/words-stand-clear", test_words_stand_clear);
  g_test_add_func ("/draw/bands/without-balance-it-says-so", test_without_balance_it_says_so);
  return g_test_run ();
}
