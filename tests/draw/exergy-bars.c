/* Exergy as bands and as bars: balanced, to scale, words clear of each other, on every size.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "../engine/plants.h"
#include "draw/bands-private.h"
#include "draw/exergy-bars.h"
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
  if (n == 3)
    plant = test_plant_set (plant, "U1.heat", 8e6);
  HlSolution *solution = hl_solve (plant, NULL);
  hl_plant_unref (plant);
  test_assert_solved (solution);
  return solution;
}

static void
test_bands_balance (void)
{
  for (guint n = 0; n < N_PLANTS; n++)
    {
      g_autoptr (HlSolution) solution = solution_of (n);
      g_autoptr (HlBands) bands = hl_bands_new_exergy (solution);
      double in = 0.0, out = 0.0;
      g_assert_true (bands->is_complete);
      for (guint i = 0; i < bands->bands->len; i++)
        {
          const HlBand *band = &g_array_index (bands->bands, HlBand, i);
          g_assert_cmpint (band->kind, !=, HL_BAND_REST);
          *(band->kind == HL_BAND_FUEL || band->kind == HL_BAND_HEAT || band->kind == HL_BAND_WATER_IN ? &in : &out) += band->power;
        }
      test_assert_near (in, test_value (solution, "plant.exergy_input"), 1e-6);
      test_assert_near (out, in, 1e-6);
      test_assert_near (hl_bands_sum (bands, HL_BAND_NET), test_value (solution, "plant.net_power"), 1e-9);
    }
}

static void
assert_inside (cairo_surface_t *surface, double width, double height)
{
  double x, y, w, h;
  cairo_recording_surface_ink_extents (surface, &x, &y, &w, &h);
  g_assert_cmpfloat (x, >=, 0.0);
  g_assert_cmpfloat (y, >=, 0.0);
  g_assert_cmpfloat (x + w, <=, width);
  g_assert_cmpfloat (y + h, <=, height);
}

static void
check_bands (const HlSolution *solution, HlUnitSet units, double width, double height)
{
  g_autoptr (HlBandsPicture) picture = hl_bands_picture_new_of (solution, HL_BANDS_EXERGY, units, width, height);
  cairo_surface_t *surface = cairo_recording_surface_create (CAIRO_CONTENT_COLOR_ALPHA, NULL);
  cairo_t *cr = cairo_create (surface);
  double top, bottom;
  hl_bands_picture_edges (picture, picture->right, &top, &bottom);
  g_assert_cmpfloat_with_epsilon (bottom - top, hl_bands_sum (picture->bands, HL_BAND_NET) * picture->scale, 2e-3);
  for (guint a = 0; a < picture->strips->len; a++)
    for (guint b = a + 1; b < picture->strips->len; b++)
      g_assert_false (hl_box_overlaps (&g_array_index (picture->strips, HlStrip, a).label, &g_array_index (picture->strips, HlStrip, b).label));
  hl_bands_picture_draw (picture, cr, hl_theme (HL_THEME_PAPER), FALSE);
  assert_inside (surface, width, height);
  cairo_destroy (cr);
  cairo_surface_destroy (surface);
}

static void
check_bars (const HlSolution *solution, HlUnitSet units, double width, double height)
{
  g_autoptr (HlExergyBars) bars = hl_exergy_bars_new (solution, units, width, height);
  cairo_surface_t *surface = cairo_recording_surface_create (CAIRO_CONTENT_COLOR_ALPHA, NULL);
  cairo_t *cr = cairo_create (surface);
  double sum = 0.0, loss = test_value (solution, "plant.exergy_loss"), expected = test_value (solution, "plant.exergy_destruction") + (isnan (loss) ? 0.0 : loss);
  double scale = hl_exergy_bars_nth (bars, 0)->bar.width / hl_exergy_bars_nth (bars, 0)->power;
  g_assert_cmpuint (hl_exergy_bars_n (bars), >, 1);
  for (guint k = 0; k < hl_exergy_bars_n (bars); k++)
    {
      const HlExergyBar *bar = hl_exergy_bars_nth (bars, k);
      sum += bar->power;
      test_assert_near (bar->bar.width, bar->power * scale, 1e-9);
      g_assert_cmpfloat (bar->name_box.x, >=, 0.0);
      g_assert_cmpfloat (bar->name_box.x + bar->name_box.width, <=, bar->bar.x);
      g_assert_cmpfloat (bar->number_box.x + bar->number_box.width, <=, width);
      g_assert_cmpfloat (bar->name_box.y + bar->name_box.height, <=, height);
      /* Largest first; what is put together may be larger than the last alone. */
      if (k > 0 && k + 1 < hl_exergy_bars_n (bars))
        g_assert_cmpfloat (bar->power, <=, hl_exergy_bars_nth (bars, k - 1)->power);
      for (guint j = 0; j < k; j++)
        g_assert_false (hl_box_overlaps (&bar->name_box, &hl_exergy_bars_nth (bars, j)->name_box));
    }
  test_assert_near (sum, expected, 1e-5);
  hl_exergy_bars_draw (bars, cr, hl_theme (HL_THEME_DARK), FALSE);
  assert_inside (surface, width, height);
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
            check_bands (solution, (HlUnitSet) units, sizes[i].width, sizes[i].height);
            check_bars (solution, (HlUnitSet) units, sizes[i].width, sizes[i].height);
          }
    }
}

static void
test_overlay (void)
{
  g_autoptr (HlSolution) solution = solution_of (0);
  const HlPlant *plant = hl_solution_plant (solution);
  double part = 0.0, sum = 0.0;
  for (guint c = 0; c < hl_plant_n_components (plant); c++)
    {
      g_autofree char *text = NULL;
      if (!hl_exergy_overlay (solution, c, &part, &text))
        continue;
      sum += part;
      g_assert_true (g_str_has_suffix (text, " %"));
    }
  test_assert_near (sum, test_value (solution, "plant.exergy_destruction") / test_value (solution, "plant.exergy_input"), 1e-5);
}

static void
test_nothing_known (void)
{
  g_autoptr (HlPlant) plant = hl_plant_new ();
  g_autoptr (HlSolution) solution = hl_solve (plant, NULL);
  g_autoptr (HlExergyBars) bars = hl_exergy_bars_new (solution, HL_UNITS_METRIC, 400.0, 300.0);
  g_autoptr (HlBands) bands = hl_bands_new_exergy (solution);
  cairo_surface_t *surface = cairo_recording_surface_create (CAIRO_CONTENT_COLOR_ALPHA, NULL);
  cairo_t *cr = cairo_create (surface);
  g_assert_cmpuint (hl_exergy_bars_n (bars), ==, 0);
  g_assert_false (bands->is_complete);
  hl_exergy_bars_draw (bars, cr, hl_theme (HL_THEME_LIGHT), FALSE);
  assert_inside (surface, 400.0, 300.0);
  cairo_destroy (cr);
  cairo_surface_destroy (surface);
}

int
main (int argc, char **argv)
{
  g_test_init (&argc, &argv, NULL);
  g_test_add_func ("/draw/exergy-bars/bands-balance", test_bands_balance);
  g_test_add_func ("/draw/exergy-bars/words-stand-clear", test_words_stand_clear);
  g_test_add_func ("/draw/exergy-bars/overlay", test_overlay);
  g_test_add_func ("/draw/exergy-bars/nothing-known", test_nothing_known);
  return g_test_run ();
}
