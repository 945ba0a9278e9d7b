/* Axes of plots: round ticks in the unit shown, and the way between values and pixels.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "draw/plot-axis.h"
#include <math.h>

/* A round step is 1, 2 or 5 times a power of ten. */
static void
assert_round (double step)
{
  double mantissa = step / pow (10.0, floor (log10 (step) + 1e-9));
  g_assert_true (fabs (mantissa - 1.0) < 1e-9 || fabs (mantissa - 2.0) < 1e-9 || fabs (mantissa - 5.0) < 1e-9);
}

static void
test_ticks_are_round_and_stand_apart (void)
{
  for (int i = 0; i < 2000; i++)
    {
      HlUnitSet units = (HlUnitSet) g_test_rand_int_range (0, HL_N_UNIT_SETS);
      double low = g_test_rand_double_range (273.15, 500.0), high = low + pow (10.0, g_test_rand_double_range (-1.0, 3.0));
      double length = g_test_rand_double_range (60.0, 1500.0), spacing = 40.0;
      HlPlotAxis axis;
      hl_plot_axis_set (&axis, HL_DIMENSION_TEMPERATURE, units, low, high, 10.0, 10.0 + length, spacing);
      assert_round (axis.step);
      g_assert_cmpuint (axis.n_ticks, >=, 1);
      for (guint k = 0; k < axis.n_ticks; k++)
        {
          double shown = hl_units_to_display (axis.ticks[k], HL_DIMENSION_TEMPERATURE, units);
          double pixel = hl_plot_axis_to_pixel (&axis, axis.ticks[k]);
          g_assert_cmpfloat (fabs (shown / axis.step - round (shown / axis.step)), <, 1e-6);
          /* The text says the value of the tick. */
          g_assert_cmpfloat (fabs (g_ascii_strtod (axis.tick_texts[k], NULL) - shown), <, 1e-6 * axis.step);
          g_assert_true (pixel > 9.99 && pixel < 10.01 + length);
          /* The range grows to its round ends after the step is chosen: by half a step at each end at the most. */
          if (k > 0)
            g_assert_cmpfloat (pixel - hl_plot_axis_to_pixel (&axis, axis.ticks[k - 1]), >, spacing * length / (length + spacing) * 0.999);
        }
    }
}

static void
test_range_holds_what_was_asked_for_and_little_more (void)
{
  HlPlotAxis axis;
  /* 0 to 9.16 kJ/(kg K), ticks at least 40 pixels apart on 400: every 1; up to 9.5. */
  hl_plot_axis_set (&axis, HL_DIMENSION_ENTROPY, HL_UNITS_METRIC, -0.15, 9160.0, 0.0, 400.0, 40.0);
  g_assert_cmpfloat_with_epsilon (axis.step, 1.0, 1e-12);
  g_assert_cmpfloat_with_epsilon (axis.low, 0.0, 1e-9);
  g_assert_cmpfloat_with_epsilon (axis.high, 9500.0, 1e-6);
  g_assert_cmpuint (axis.n_ticks, ==, 10);
  g_assert_cmpstr (axis.tick_texts[0], ==, "0");
  g_assert_cmpstr (axis.tick_texts[9], ==, "9");
}

static void
test_pixels_and_values_are_inverse (void)
{
  HlPlotAxis axis;
  hl_plot_axis_set (&axis, HL_DIMENSION_TEMPERATURE, HL_UNITS_US, 280.0, 800.0, 500.0, 20.0, 30.0);
  g_assert_cmpfloat_with_epsilon (hl_plot_axis_to_pixel (&axis, axis.low), 500.0, 1e-9);
  g_assert_cmpfloat_with_epsilon (hl_plot_axis_to_pixel (&axis, axis.high), 20.0, 1e-9);
  for (double T = 290.0; T < 800.0; T += 17.0)
    g_assert_cmpfloat_with_epsilon (hl_plot_axis_from_pixel (&axis, hl_plot_axis_to_pixel (&axis, T)), T, 1e-9);
}

static void
test_title_names_the_unit (void)
{
  HlPlotAxis axis;
  g_autofree char *temperature = NULL, *ratio = NULL;
  hl_plot_axis_set (&axis, HL_DIMENSION_TEMPERATURE, HL_UNITS_METRIC, 280.0, 800.0, 0.0, 100.0, 30.0);
  temperature = hl_plot_axis_title (&axis, "temperature");
  g_assert_cmpstr (temperature, ==, "temperature °C");
  hl_plot_axis_set (&axis, HL_DIMENSION_RATIO, HL_UNITS_METRIC, 0.0, 1.0, 0.0, 100.0, 30.0);
  ratio = hl_plot_axis_title (&axis, "quality");
  g_assert_cmpstr (ratio, ==, "quality");
}

/* Equal ratios, equal distances; ticks at 1, 2, 5 or fewer, apart, without needless zeros. */
static void
test_axis_by_decades (void)
{
  static const double ranges[][2] = { { 1e3, 1e7 }, { 5e4, 6e5 }, { 6e2, 3e8 } };
  for (guint i = 0; i < G_N_ELEMENTS (ranges); i++)
    for (double length = 100.0; length < 1500.0; length *= 1.7)
      {
        HlPlotAxis axis;
        hl_plot_axis_set_log (&axis, HL_DIMENSION_PRESSURE, HL_UNITS_METRIC, ranges[i][0], ranges[i][1], 20.0 + length, 20.0, 24.0);
        g_assert_cmpfloat (axis.low, <=, ranges[i][0] * 1.000001);
        g_assert_cmpfloat (axis.high, >=, ranges[i][1] * 0.999999);
        g_assert_cmpfloat_with_epsilon (hl_plot_axis_to_pixel (&axis, axis.low), 20.0 + length, 1e-9);
        g_assert_cmpfloat_with_epsilon (hl_plot_axis_to_pixel (&axis, axis.high), 20.0, 1e-9);
        g_assert_cmpfloat_with_epsilon (hl_plot_axis_to_pixel (&axis, sqrt (axis.low * axis.high)), 20.0 + length / 2.0, 1e-9);
        g_assert_cmpfloat_with_epsilon (hl_plot_axis_from_pixel (&axis, hl_plot_axis_to_pixel (&axis, 2e5)), 2e5, 1e-6);
        g_assert_cmpuint (axis.n_ticks, >=, 1);
        for (guint k = 0; k < axis.n_ticks; k++)
          {
            double shown = g_ascii_strtod (axis.tick_texts[k], NULL);
            g_assert_cmpfloat_with_epsilon (hl_units_from_display (shown, HL_DIMENSION_PRESSURE, HL_UNITS_METRIC) / axis.ticks[k], 1.0, 1e-9);
            if (k > 0)
              g_assert_cmpfloat (hl_plot_axis_to_pixel (&axis, axis.ticks[k - 1]) - hl_plot_axis_to_pixel (&axis, axis.ticks[k]), >, 20.0);
          }
      }
}

int
main (int argc, char **argv)
{
  g_test_init (&argc, &argv, NULL);
  g_test_add_func ("/draw/plot-axis/ticks-are-round-and-stand-apart", test_ticks_are_round_and_stand_apart);
  g_test_add_func ("/draw/plot-axis/range-holds-what-was-asked-for", test_range_holds_what_was_asked_for_and_little_more);
  g_test_add_func ("/draw/plot-axis/pixels-and-values-are-inverse", test_pixels_and_values_are_inverse);
  g_test_add_func ("/draw/plot-axis/title-names-the-unit", test_title_names_the_unit);
  g_test_add_func ("/draw/plot-axis/by-decades", test_axis_by_decades);
  return g_test_run ();
}
