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

/* Machines on shafts: pump behind a gearbox, feed pump turbine, motor as a component of its own; a heat pump buys its power. */
static const char *const shaft_plants[] = {
  "heat_input Q1 pressure_loss=0 steam.T=750\nturbine T1 inlet.p=60e5 inlet.m=10 exhaust.p=1e4 isentropic_efficiency=0.78 mechanical_efficiency=0.98\n"
  "gearbox GB1 efficiency=0.97\ngearbox GB2 efficiency=0.985\ngenerator G1 efficiency=0.96\ncondenser C1 cooling:1 subcooling=0\npump P1 isentropic_efficiency=0.7\n"
  "Q1.steam > T1.inlet\nT1.exhaust > C1.steam\nC1.condensate > P1.inlet\nP1.outlet > Q1.feed\nshaft P1 GB2 T1 GB1 G1\nplant other_consumption_fraction=0.03\n",
  "heat_input Q1 pressure_loss=0 steam.T=700\nturbine T1 extractions:1 inlet.p=40e5 extraction1.p=6e5 exhaust.p=1e4 isentropic_efficiency=0.8 mechanical_efficiency=0.98\n"
  "feed_pump_turbine FT1 isentropic_efficiency=0.76 mechanical_efficiency=0.97\ncondenser C1 cooling:1 subcooling=0\nmixer M1 inlets:2\npump P1 isentropic_efficiency=0.7\n"
  "Q1.steam > T1.inlet\nT1.extraction1 > FT1.inlet\nT1.exhaust > M1.inlet1\nFT1.exhaust > M1.inlet2\nM1.outlet > C1.steam\n"
  "C1.condensate > P1.inlet\nP1.outlet > Q1.feed\nshaft FT1 P1\nplant net_power=5e6 other_consumption_fraction=0\n",
  "heat_input Q1 pressure_loss=0 steam.p=1e5 steam.x=1\ncompressor K1 isentropic_efficiency=0.75\nmotor EM1 efficiency=0.95\n"
  "district_heater DH1 heat=1e6 drain_subcooling=0 terminal_difference=5 return_T=370 flow_T=400 water_p=8e5 water_pressure_loss=0\nvalve V1\n"
  "Q1.steam > K1.inlet\nK1.outlet > DH1.steam\nDH1.drain > V1.inlet\nV1.outlet > Q1.feed\nshaft EM1 K1\n",
  "heat_input Q1 pressure_loss=0 steam.p=1e5 steam.x=1\ncompressor K1 isentropic_efficiency=0.75 motor_efficiency=0.95\n"
  "district_heater DH1 heat=1e6 drain_subcooling=0 terminal_difference=5 return_T=370 flow_T=400 water_p=8e5 water_pressure_loss=0\nvalve V1\n"
  "Q1.steam > K1.inlet\nK1.outlet > DH1.steam\nDH1.drain > V1.inlet\nV1.outlet > Q1.feed\n",
};

static double
of_band (const HlBands *bands, HlBandKind kind, const char *name)
{
  for (guint i = 0; i < bands->bands->len; i++)
    {
      const HlBand *band = &g_array_index (bands->bands, HlBand, i);
      if (band->kind == kind && g_str_equal (band->name, name))
        return band->power;
    }
  return 0.0;
}

static void
test_shafts_add_up (void)
{
  for (guint n = 0; n < G_N_ELEMENTS (shaft_plants); n++)
    {
      g_autoptr (HlPlant) plant = test_plant (shaft_plants[n]);
      g_autoptr (HlSolution) solution = hl_solve (plant, NULL);
      g_autoptr (HlBands) bands = hl_bands_new (solution);
      test_assert_solved (solution);
      g_assert_true (bands->is_complete);
      g_assert_cmpfloat (hl_bands_sum (bands, HL_BAND_REST), ==, 0.0);
      if (n == 0)
        {
          test_assert_near (of_band (bands, HL_BAND_SHAFT_LOSS, "gearbox losses"), test_value (solution, "GB1.loss") + test_value (solution, "GB2.loss"), 1e-9);
          test_assert_near (of_band (bands, HL_BAND_SHAFT_LOSS, "generator losses"), 0.04 * test_value (solution, "G1.shaft_power"), 1e-9);
          g_assert_cmpfloat (of_band (bands, HL_BAND_OWN, "motor losses"), ==, 0.0);
        }
      if (n >= 2)
        {
          double power = test_value (solution, "K1.power");
          test_assert_near (of_band (bands, HL_BAND_OWN, "motor losses"), power / 0.95 - power, 1e-8);
          test_assert_near (of_band (bands, HL_BAND_POWER, "power from outside"), power / 0.95, 1e-9);
          test_assert_near (hl_bands_sum (bands, HL_BAND_DELIVERED), 1e6, 1e-9);
        }
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
  g_test_add_func ("/draw/bands/shafts-add-up", test_shafts_add_up);
  g_test_add_func ("/draw/bands/bands-are-the-plants-results", test_bands_are_the_plants_results);
  g_test_add_func ("/draw/bands/widths-are-to-scale", test_widths_are_to_scale);
  g_test_add_func ("/draw/bands/words-stand-clear", test_words_stand_clear);
  g_test_add_func ("/draw/bands/without-balance-it-says-so", test_without_balance_it_says_so);
  return g_test_run ();
}
