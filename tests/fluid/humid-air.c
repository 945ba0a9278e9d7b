/* Humid air against psychrometric tables and its own laws.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "fluid/humid-air.h"

#include "gas-check.h"

static double
of_air (const char *kind, const char *subject G_GNUC_UNUSED, const char *at)
{
  g_auto (GStrv) temperatures = g_strsplit (at, "/", 2);
  double T = g_ascii_strtod (temperatures[0], NULL);
  HlHumidAir air = { 0 };
  HlSaturatedAir saturated = { 0 };
  if (temperatures[1] != NULL)
    g_assert_cmpint (hl_humid_air_by_wet_bulb (101325.0, T, g_ascii_strtod (temperatures[1], NULL), &air), ==, HL_OK);
  else
    g_assert_cmpint (hl_humid_air_saturated (101325.0, T, &saturated), ==, HL_OK);
  const struct { const char *kind; double ours; } rows[] = {
    { "humid_w", 1e3 * air.humidity_ratio }, { "humid_h", air.h / 1e3 }, { "humid_dew", air.T_dew }, { "humid_phi", 1e2 * air.relative_humidity },
    { "humid_v", air.v }, { "saturated_w", 1e3 * saturated.humidity_ratio }, { "saturated_h", saturated.h / 1e3 },
  };
  for (gsize i = 0; i < G_N_ELEMENTS (rows); i++)
    if (strcmp (rows[i].kind, kind) == 0)
      return rows[i].ours;
  return NAN;
}

static void
test_agrees_with_psychrometric_tables (void)
{
  static const char *const kinds[] = { "humid_w", "humid_h", "humid_dew", "humid_phi", "humid_v", "saturated_w", "saturated_h" };
  for (gsize i = 0; i < G_N_ELEMENTS (kinds); i++)
    check_published (kinds[i], of_air);
}

/* Law: one measure of moisture leads to the others and back. */
static void
test_measures_come_back (void)
{
  for (double T = 275.0; T < 340.0; T += 5.0)
    for (double phi = 0.05; phi <= 1.0; phi += 0.19)
      {
        HlHumidAir a, b;
        g_assert_cmpint (hl_humid_air_by_relative_humidity (95000.0, T, phi, &a), ==, HL_OK);
        g_assert_cmpfloat_with_epsilon (a.relative_humidity, phi, 1e-12);
        g_assert_cmpint (hl_humid_air_by_ratio (95000.0, T, a.humidity_ratio, &b), ==, HL_OK);
        g_assert_cmpfloat_with_epsilon (b.relative_humidity, phi, 1e-12);
        g_assert_cmpfloat (a.T_dew, <=, T + 1e-9);
        if (isnan (a.T_wet))
          continue;
        g_assert_cmpfloat (a.T_wet, <=, T + 1e-9);
        g_assert_cmpfloat (a.T_wet, >=, a.T_dew - 1e-6);
        g_assert_cmpint (hl_humid_air_by_wet_bulb (95000.0, T, a.T_wet, &b), ==, HL_OK);
        g_assert_cmpfloat_with_epsilon (b.humidity_ratio, a.humidity_ratio, 1e-9);
      }
}

/* At saturation dry bulb, wet bulb and dew point are one; the slopes are those of the functions. */
static void
test_saturated_air (void)
{
  HlHumidAir air;
  HlSaturatedAir at, low, high;
  g_assert_cmpint (hl_humid_air_by_relative_humidity (101325.0, 300.0, 1.0, &air), ==, HL_OK);
  g_assert_cmpfloat_with_epsilon (air.T_dew, 300.0, 1e-6);
  g_assert_cmpfloat_with_epsilon (air.T_wet, 300.0, 1e-6);
  g_assert_cmpint (hl_humid_air_saturated (101325.0, 300.0, &at), ==, HL_OK);
  g_assert_cmpfloat_with_epsilon (at.h, air.h, 1e-6);
  g_assert_cmpint (hl_humid_air_saturated (101325.0, 299.99, &low), ==, HL_OK);
  g_assert_cmpint (hl_humid_air_saturated (101325.0, 300.01, &high), ==, HL_OK);
  g_assert_cmpfloat_with_epsilon ((high.h - low.h) / 0.02 / at.h_T, 1.0, 1e-6);
  g_assert_cmpfloat_with_epsilon ((high.humidity_ratio - low.humidity_ratio) / 0.02 / at.humidity_ratio_T, 1.0, 1e-6);
}

/* As a medium it has the moisture it was made with, and its dew point. */
static void
test_humid_air_is_a_medium (void)
{
  HlHumidAir air;
  g_assert_cmpint (hl_humid_air_by_relative_humidity (101325.0, 303.15, 0.6, &air), ==, HL_OK);
  const HlFluid *gas = hl_humid_air_gas (air.humidity_ratio, NULL);
  double mass[32];
  hl_gas_mass (gas, mass);
  double w = mass[hl_gas_species_find ("H2O")];
  g_assert_cmpfloat_with_epsilon (w / (1.0 - w), air.humidity_ratio, 1e-8);
  g_assert_cmpfloat_with_epsilon (hl_gas_water_dew_point (gas, 101325.0), air.T_dew, 1e-5);
  g_assert_true (hl_humid_air_gas (0.0, NULL) != NULL);
  g_assert_null (hl_humid_air_gas (-0.1, NULL));
}

static void
test_what_is_no_air_is_refused (void)
{
  HlHumidAir air;
  HlSaturatedAir saturated;
  g_assert_cmpint (hl_humid_air_by_relative_humidity (101325.0, 300.0, 1.01, &air), ==, HL_OUTSIDE_RANGE);
  g_assert_cmpint (hl_humid_air_by_relative_humidity (101325.0, 300.0, NAN, &air), ==, HL_OUTSIDE_RANGE);
  g_assert_cmpint (hl_humid_air_by_relative_humidity (101325.0, 400.0, 1.0, &air), ==, HL_OUTSIDE_RANGE);
  g_assert_cmpint (hl_humid_air_by_relative_humidity (101325.0, 150.0, 0.5, &air), ==, HL_OUTSIDE_RANGE);
  g_assert_cmpint (hl_humid_air_by_wet_bulb (101325.0, 300.0, 301.0, &air), ==, HL_OUTSIDE_RANGE);
  g_assert_cmpint (hl_humid_air_by_wet_bulb (101325.0, 330.0, 280.0, &air), ==, HL_OUTSIDE_RANGE);     /* dry air is warmer than that */
  g_assert_cmpint (hl_humid_air_by_ratio (101325.0, 300.0, 0.05, &air), ==, HL_OUTSIDE_RANGE);
  g_assert_cmpint (hl_humid_air_saturated (101325.0, 374.0, &saturated), ==, HL_OUTSIDE_RANGE);
  /* Frost: over ice, no wet bulb. */
  g_assert_cmpint (hl_humid_air_by_relative_humidity (101325.0, 263.15, 0.8, &air), ==, HL_OK);
  g_assert_true (isnan (air.T_wet));
  g_assert_cmpfloat (air.T_dew, <, 263.15);
}

int
main (int argc, char *argv[])
{
  g_test_init (&argc, &argv, NULL);
  g_test_add_func ("/fluid/humid-air/tables", test_agrees_with_psychrometric_tables);
  g_test_add_func ("/fluid/humid-air/measures", test_measures_come_back);
  g_test_add_func ("/fluid/humid-air/saturated", test_saturated_air);
  g_test_add_func ("/fluid/humid-air/medium", test_humid_air_is_a_medium);
  g_test_add_func ("/fluid/humid-air/refused", test_what_is_no_air_is_refused);
  return g_test_run ();
}
