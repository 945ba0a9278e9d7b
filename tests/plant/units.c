/* Units: factors, rounding, round trips.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "plant-test.h"

static double
parse (const char *text, HlDimension dimension)
{
  GError *error = NULL;
  double si = NAN;
  hl_units_parse (text, dimension, HL_UNITS_METRIC, 101325.0, &si, &error);
  g_assert_no_error (error);
  return si;
}

/* NIST Special Publication 811 (2008), appendix B.8, as printed there; the steam enthalpy and entropy units by the
 * International Conference on the Properties of Steam (1956); heat rates from 1 kWh = 3412.141633 Btu. */
static void
test_factors_agree_with_sp811 (void)
{
  static const struct { const char *text; HlDimension dimension; double si, relative; } rows[] = {
    { "1 bar", HL_DIMENSION_PRESSURE, 1e5, 0 },
    { "1 bara", HL_DIMENSION_PRESSURE, 1e5, 0 },
    { "1 mbar", HL_DIMENSION_PRESSURE, 100, 0 },
    { "1 kPa", HL_DIMENSION_PRESSURE, 1e3, 0 },
    { "1 MPa", HL_DIMENSION_PRESSURE, 1e6, 0 },
    { "1 Pa", HL_DIMENSION_PRESSURE, 1, 0 },
    { "1 atm", HL_DIMENSION_PRESSURE, 101325, 0 },
    { "1 psi", HL_DIMENSION_PRESSURE, 6894.757293168, 1e-12 },
    { "1 psia", HL_DIMENSION_PRESSURE, 6894.757293168, 1e-12 },
    { "1 inHg", HL_DIMENSION_PRESSURE, 3386.389, 0 },
    { "2 inHg abs", HL_DIMENSION_PRESSURE, 6772.778, 1e-15 },
    { "1 mmHg", HL_DIMENSION_PRESSURE, 133.3224, 0 },
    { "1 kgf/cm2", HL_DIMENSION_PRESSURE, 98066.5, 0 },
    { "1 kgf/cm²", HL_DIMENSION_PRESSURE, 98066.5, 0 },
    { "1 kg/cm2", HL_DIMENSION_PRESSURE, 98066.5, 0 },
    { "1 t/h", HL_DIMENSION_MASS_FLOW, 0.2777777777777778, 1e-15 },
    { "1 kg/h", HL_DIMENSION_MASS_FLOW, 2.777777777777778e-4, 1e-15 },
    { "1 lb/h", HL_DIMENSION_MASS_FLOW, 1.259978806e-4, 1e-9 },
    { "1 klb/h", HL_DIMENSION_MASS_FLOW, 0.1259978806, 1e-9 },
    { "1 lb/s", HL_DIMENSION_MASS_FLOW, 0.45359237, 0 },
    { "1 Btu/lb", HL_DIMENSION_ENTHALPY, 2326, 0 },
    { "1 kcal/kg", HL_DIMENSION_ENTHALPY, 4186.8, 0 },
    { "1 kJ/kg", HL_DIMENSION_ENTHALPY, 1e3, 0 },
    { "1 J/kg", HL_DIMENSION_ENTHALPY, 1, 0 },
    { "1 Btu/(lb °F)", HL_DIMENSION_ENTROPY, 4186.8, 1e-15 },
    { "1 Btu/lb°F", HL_DIMENSION_ENTROPY, 4186.8, 1e-15 },
    { "1 kJ/(kg K)", HL_DIMENSION_ENTROPY, 1e3, 0 },
    { "1 kJ/kgK", HL_DIMENSION_ENTROPY, 1e3, 0 },
    { "1 kJ/(kg·K)", HL_DIMENSION_ENTROPY, 1e3, 0 },
    { "1 ft3/lb", HL_DIMENSION_VOLUME, 0.06242796058, 1e-9 },
    { "1 m³/kg", HL_DIMENSION_VOLUME, 1, 0 },
    { "1 hp", HL_DIMENSION_POWER, 745.6998716, 1e-9 },
    { "1 PS", HL_DIMENSION_POWER, 735.49875, 0 },
    { "1 Btu/h", HL_DIMENSION_POWER, 0.2930710702, 1e-9 },
    { "1 MMBtu/h", HL_DIMENSION_POWER, 293071.0702, 1e-9 },
    { "1 W", HL_DIMENSION_POWER, 1, 0 },
    { "1 kW", HL_DIMENSION_POWER, 1e3, 0 },
    { "1 MW", HL_DIMENSION_POWER, 1e6, 0 },
    { "1 kW/K", HL_DIMENSION_CONDUCTANCE, 1e3, 0 },
    { "1 W/K", HL_DIMENSION_CONDUCTANCE, 1, 0 },
    { "1 Btu/(h °F)", HL_DIMENSION_CONDUCTANCE, 0.527527926, 1e-8 },
    { "1 ft", HL_DIMENSION_LENGTH, 0.3048, 0 },
    { "1 m", HL_DIMENSION_LENGTH, 1, 0 },
    { "3600 kJ/kWh", HL_DIMENSION_HEAT_RATE, 1, 1e-15 },
    { "3412.141633 Btu/kWh", HL_DIMENSION_HEAT_RATE, 1, 1e-9 },
    { "3600 kg/kWh", HL_DIMENSION_STEAM_RATE, 1e-3, 1e-15 },
    { "1 lb/kWh", HL_DIMENSION_STEAM_RATE, 0.45359237 / 3.6e6, 1e-15 },
    { "83 %", HL_DIMENSION_RATIO, 0.83, 0 },
    { "83%", HL_DIMENSION_RATIO, 0.83, 0 },
    { "0.92", HL_DIMENSION_RATIO, 0.92, 0 },
    { "480 °C", HL_DIMENSION_TEMPERATURE, 753.15, 0 },
    { "480 ºC", HL_DIMENSION_TEMPERATURE, 753.15, 0 },
    { "480 C", HL_DIMENSION_TEMPERATURE, 753.15, 0 },
    { "480 c", HL_DIMENSION_TEMPERATURE, 753.15, 0 },
    { "480℃", HL_DIMENSION_TEMPERATURE, 753.15, 0 },
    { "753.15 K", HL_DIMENSION_TEMPERATURE, 753.15, 0 },
    { "32 °F", HL_DIMENSION_TEMPERATURE, 273.15, 1e-15 },
    { "212 F", HL_DIMENSION_TEMPERATURE, 373.15, 1e-15 },
    { "900 °F", HL_DIMENSION_TEMPERATURE, 755.3722222222222, 1e-15 },
    { "-40 °F", HL_DIMENSION_TEMPERATURE, 233.15, 1e-15 },
    { "−40 °C", HL_DIMENSION_TEMPERATURE, 233.15, 1e-15 },
  };
  for (gsize i = 0; i < G_N_ELEMENTS (rows); i++)
    assert_close (parse (rows[i].text, rows[i].dimension), rows[i].si, rows[i].relative);
}

/* By definition of the scales: a degree is an interval here, without the 32 of Fahrenheit. */
static void
test_differences_have_no_offset (void)
{
  g_assert_cmpfloat (parse ("5 K", HL_DIMENSION_TEMPERATURE_DIFFERENCE), ==, 5.0);
  g_assert_cmpfloat (parse ("5 °C", HL_DIMENSION_TEMPERATURE_DIFFERENCE), ==, 5.0);
  assert_close (parse ("9 °F", HL_DIMENSION_TEMPERATURE_DIFFERENCE), 5.0, 1e-15);
  g_assert_cmpfloat (parse ("-2", HL_DIMENSION_TEMPERATURE_DIFFERENCE), ==, -2.0);
  g_assert_cmpfloat (parse ("2 bar", HL_DIMENSION_PRESSURE_DIFFERENCE), ==, 2e5);
}

/* ISO 2533 troposphere: 0, 500, 1000, 2000 m give 101325, 95461, 89875, 79495 Pa. */
static void
test_gauge_pressure_counts_from_the_site (void)
{
  GError *error = NULL;
  double si;
  g_assert_cmpfloat (hl_site_pressure (0.0), ==, 101325.0);
  g_assert_cmpfloat_with_epsilon (hl_site_pressure (500.0), 95461.0, 0.6);
  g_assert_cmpfloat_with_epsilon (hl_site_pressure (1000.0), 89875.0, 0.6);
  g_assert_cmpfloat_with_epsilon (hl_site_pressure (2000.0), 79495.0, 0.6);
  g_assert_true (hl_units_parse ("7 barg", HL_DIMENSION_PRESSURE, HL_UNITS_METRIC, 95461.0, &si, &error));
  g_assert_cmpfloat (si, ==, 795461.0);
  g_assert_true (hl_units_parse ("100 psig", HL_DIMENSION_PRESSURE, HL_UNITS_US, 101325.0, &si, &error));
  assert_close (si, 689475.7293168 + 101325.0, 1e-12);
  g_assert_true (hl_units_parse ("-0.4 bar(g)", HL_DIMENSION_PRESSURE, HL_UNITS_METRIC, 101325.0, &si, &error));
  g_assert_cmpfloat (si, ==, 61325.0);
  g_assert_no_error (error);
}

static void
test_bare_numbers_take_the_unit_of_the_set (void)
{
  static const struct { HlDimension dimension; HlUnitSet set; double number, si; } rows[] = {
    { HL_DIMENSION_PRESSURE, HL_UNITS_METRIC, 80, 80e5 },
    { HL_DIMENSION_PRESSURE, HL_UNITS_SI, 80, 80e3 },
    { HL_DIMENSION_PRESSURE, HL_UNITS_US, 1000, 6894757.293168 },
    { HL_DIMENSION_TEMPERATURE, HL_UNITS_METRIC, 20, 293.15 },
    { HL_DIMENSION_TEMPERATURE, HL_UNITS_SI, 20, 20 },
    { HL_DIMENSION_TEMPERATURE, HL_UNITS_US, 212, 373.15 },
    { HL_DIMENSION_TEMPERATURE_DIFFERENCE, HL_UNITS_US, 9, 5 },
    { HL_DIMENSION_POWER, HL_UNITS_METRIC, 12, 12e6 },
    { HL_DIMENSION_POWER, HL_UNITS_SI, 12, 12e3 },
    { HL_DIMENSION_MASS_FLOW, HL_UNITS_METRIC, 12, 12 },
    { HL_DIMENSION_MASS_FLOW, HL_UNITS_US, 1, 0.12599788055555555 },
    { HL_DIMENSION_COUNT, HL_UNITS_US, 3, 3 },
  };
  for (gsize i = 0; i < G_N_ELEMENTS (rows); i++)
    {
      GError *error = NULL;
      g_autofree char *text = g_strdup_printf ("%g", rows[i].number);
      double si;
      g_assert_true (hl_units_parse (text, rows[i].dimension, rows[i].set, 101325.0, &si, &error));
      assert_close (si, rows[i].si, 1e-12);
      assert_close (hl_units_from_display (rows[i].number, rows[i].dimension, rows[i].set), rows[i].si, 1e-12);
      assert_close (hl_units_to_display (rows[i].si, rows[i].dimension, rows[i].set), rows[i].number, 1e-12);
    }
}

/* Rounding of the trade: p 4 digits, T 0.1 K, h 0.1 kJ/kg, m 0.01 kg/s, x 0.001, power 0.1 %, heat rate 1 kJ/kWh
 * (common practice, no source). */
static void
test_rounding (void)
{
  static const struct { double si; HlDimension dimension; HlUnitSet set; const char *text; } rows[] = {
    { 168e5, HL_DIMENSION_PRESSURE, HL_UNITS_METRIC, "168.0 bar" },
    { 7000, HL_DIMENSION_PRESSURE, HL_UNITS_METRIC, "0.07000 bar" },
    { 99996, HL_DIMENSION_PRESSURE, HL_UNITS_METRIC, "1.000 bar" },
    { 1234567890, HL_DIMENSION_PRESSURE, HL_UNITS_SI, "1234568 kPa" },
    { 7997918.46, HL_DIMENSION_PRESSURE, HL_UNITS_US, "1160 psia" },
    { 753.15, HL_DIMENSION_TEMPERATURE, HL_UNITS_METRIC, "480.0 °C" },
    { 273.14, HL_DIMENSION_TEMPERATURE, HL_UNITS_METRIC, "0.0 °C" },
    { 753.15, HL_DIMENSION_TEMPERATURE, HL_UNITS_US, "896.0 °F" },
    { 753.15, HL_DIMENSION_TEMPERATURE, HL_UNITS_SI, "753.1 K" },
    { 5.6, HL_DIMENSION_TEMPERATURE_DIFFERENCE, HL_UNITS_METRIC, "5.6 K" },
    { 9.7222, HL_DIMENSION_MASS_FLOW, HL_UNITS_METRIC, "9.72 kg/s" },
    { 0.003456, HL_DIMENSION_MASS_FLOW, HL_UNITS_METRIC, "0.00346 kg/s" },
    { 0, HL_DIMENSION_MASS_FLOW, HL_UNITS_METRIC, "0.00 kg/s" },
    { 2650040, HL_DIMENSION_ENTHALPY, HL_UNITS_METRIC, "2650.0 kJ/kg" },
    { 6548.25, HL_DIMENSION_ENTROPY, HL_UNITS_METRIC, "6.5483 kJ/(kg K)" },
    { 0.00100788, HL_DIMENSION_VOLUME, HL_UNITS_METRIC, "0.0010079 m³/kg" },
    { 12.5e6, HL_DIMENSION_POWER, HL_UNITS_METRIC, "12.50 MW" },
    { 999.96e3, HL_DIMENSION_POWER, HL_UNITS_METRIC, "1000 kW" },
    { 40e3, HL_DIMENSION_POWER, HL_UNITS_METRIC, "40.00 kW" },
    { -40e3, HL_DIMENSION_POWER, HL_UNITS_METRIC, "-40.00 kW" },
    { 250, HL_DIMENSION_POWER, HL_UNITS_METRIC, "250.0 W" },
    { 12.5e6, HL_DIMENSION_POWER, HL_UNITS_SI, "12500 kW" },
    { 123456, HL_DIMENSION_CONDUCTANCE, HL_UNITS_METRIC, "123.5 kW/K" },
    { 8125.0 / 3600.0, HL_DIMENSION_HEAT_RATE, HL_UNITS_METRIC, "8125 kJ/kWh" },
    { 4.123 / 3.6e6, HL_DIMENSION_STEAM_RATE, HL_UNITS_METRIC, "4.12 kg/kWh" },
    { 0.83, HL_DIMENSION_RATIO, HL_UNITS_METRIC, "0.830" },
    { 0.00001, HL_DIMENSION_RATIO, HL_UNITS_METRIC, "0.000010" },
    { NAN, HL_DIMENSION_PRESSURE, HL_UNITS_METRIC, "–" },
    { INFINITY, HL_DIMENSION_POWER, HL_UNITS_METRIC, "–" },
  };
  for (gsize i = 0; i < G_N_ELEMENTS (rows); i++)
    {
      g_autofree char *text = hl_units_format (rows[i].si, rows[i].dimension, rows[i].set);
      g_assert_cmpstr (text, ==, rows[i].text);
    }
}

/* The number alone keeps the unit of the set, as its label stands beside it. */
static void
test_number_alone_fits_the_label (void)
{
  g_autofree char *power = hl_units_format_number (40e3, HL_DIMENSION_POWER, HL_UNITS_METRIC);
  g_autofree char *none = hl_units_format_number (NAN, HL_DIMENSION_POWER, HL_UNITS_METRIC);
  g_assert_cmpstr (hl_units_label (HL_DIMENSION_POWER, HL_UNITS_METRIC), ==, "MW");
  g_assert_cmpstr (power, ==, "0.04000");
  g_assert_cmpstr (none, ==, "–");
  g_assert_cmpstr (hl_units_label_of (40e3, HL_DIMENSION_POWER, HL_UNITS_METRIC), ==, "kW");
  g_assert_cmpstr (hl_units_label_of (40e6, HL_DIMENSION_POWER, HL_UNITS_METRIC), ==, "MW");
  g_assert_cmpstr (hl_units_label_of (40, HL_DIMENSION_POWER, HL_UNITS_SI), ==, "W");
  g_assert_cmpstr (hl_units_label_of (0, HL_DIMENSION_POWER, HL_UNITS_SI), ==, "kW");
}

static void
test_exact_text_is_short (void)
{
  static const struct { double si; HlDimension dimension; const char *text; } rows[] = {
    { 80e5, HL_DIMENSION_PRESSURE, "80 bar" },
    { 7000, HL_DIMENSION_PRESSURE, "0.07 bar" },
    { 753.15, HL_DIMENSION_TEMPERATURE, "480 °C" },
    { 40e3, HL_DIMENSION_POWER, "40 kW" },
    { 12.5e6, HL_DIMENSION_POWER, "12.5 MW" },
    { 0.83, HL_DIMENSION_RATIO, "0.83" },
    { 2650e3, HL_DIMENSION_ENTHALPY, "2650 kJ/kg" },
    { 3, HL_DIMENSION_COUNT, "3" },
    { NAN, HL_DIMENSION_PRESSURE, "–" },
  };
  for (gsize i = 0; i < G_N_ELEMENTS (rows); i++)
    {
      g_autofree char *text = hl_units_format_exact (rows[i].si, rows[i].dimension, HL_UNITS_METRIC);
      g_assert_cmpstr (text, ==, rows[i].text);
    }
}

/* Typed numbers become the SI number that a person would write down, not a neighbour of it. */
static void
test_typed_numbers_stay_neat (void)
{
  g_assert_cmpfloat (parse ("0.07 bar", HL_DIMENSION_PRESSURE), ==, 7000.0);
  g_assert_cmpfloat (parse ("0.0336 bar", HL_DIMENSION_PRESSURE), ==, 3360.0);
  g_assert_cmpfloat (parse ("99.9 %", HL_DIMENSION_RATIO), ==, 0.999);
  g_assert_cmpfloat (parse ("485.1 °C", HL_DIMENSION_TEMPERATURE), ==, 758.25);
  g_assert_cmpfloat (parse ("538 °C", HL_DIMENSION_TEMPERATURE), ==, 811.15);
  g_assert_cmpfloat (parse ("2.3 g/s", HL_DIMENSION_MASS_FLOW), ==, 0.0023);
  g_assert_cmpfloat (parse ("16.8 MPa", HL_DIMENSION_PRESSURE), ==, 16.8e6);
}

/* Law: every value comes back bit by bit from its exact text, in every set and dimension; and from the other
 * conversions within the rounding of four operations. */
static void
test_round_trips (void)
{
  GRand *rand = g_rand_new_with_seed (20240611);
  for (int n = 0; n < 20000; n++)
    {
      HlDimension dimension = (HlDimension) g_rand_int_range (rand, 0, HL_N_DIMENSIONS);
      HlUnitSet set = (HlUnitSet) g_rand_int_range (rand, 0, HL_N_UNIT_SETS);
      double si = exp (g_rand_double_range (rand, log (1e-6), log (1e9))), back;
      g_autofree char *text = hl_units_format_exact (si, dimension, set);
      GError *error = NULL;
      g_assert_true (hl_units_parse (text, dimension, set, 101325.0, &back, &error));
      if (memcmp (&back, &si, sizeof si) != 0)
        g_error ("%.17g became “%s” and came back as %.17g", si, text, back);
      back = hl_units_from_display (hl_units_to_display (si, dimension, set), dimension, set);
      g_assert_cmpfloat_with_epsilon (back, si, 4.0 * 2.3e-16 * (fabs (si) + 600.0));
    }
  for (int n = 0; n < 2000; n++)
    {
      double ratio = g_rand_double (rand), back;
      g_autofree char *text = hl_units_format_percent (ratio);
      g_assert_true (hl_units_parse (text, HL_DIMENSION_RATIO, HL_UNITS_METRIC, 0.0, &back, NULL));
      g_assert_cmpmem (&back, sizeof back, &ratio, sizeof ratio);
    }
  g_rand_free (rand);
}

static void
test_numbers_for_files (void)
{
  static const struct { double number; const char *text; } rows[] = {
    { 0.1, "0.1" }, { 7000, "7000" }, { 1e-5, "1e-05" }, { 1.0 / 3.0, "0.3333333333333333" }, { 0.1 + 0.2, "0.30000000000000004" },
    { -0.5, "-0.5" }, { 1e300, "1e+300" },
  };
  for (gsize i = 0; i < G_N_ELEMENTS (rows); i++)
    {
      g_autofree char *text = hl_number_to_text (rows[i].number);
      g_assert_cmpstr (text, ==, rows[i].text);
    }
}

static void
test_ids_and_names (void)
{
  HlUnitSet set;
  for (int i = 0; i < HL_N_UNIT_SETS; i++)
    {
      g_assert_true (hl_unit_set_from_id (hl_unit_set_id ((HlUnitSet) i), &set));
      g_assert_cmpint (set, ==, i);
    }
  g_assert_false (hl_unit_set_from_id ("imperial", &set));
  for (int i = 0; i < HL_N_DIMENSIONS; i++)
    {
      const char *unit = hl_dimension_si_unit ((HlDimension) i);
      double si = 0.0;
      g_autofree char *text = g_strdup_printf ("7.25 %s", unit);
      g_assert_cmpuint (strlen (hl_dimension_name ((HlDimension) i)), >, 0);
      /* the SI unit that is named is a unit of the table, with factor 1 */
      g_assert_true (hl_units_parse (text, (HlDimension) i, HL_UNITS_US, 0.0, &si, NULL) || *unit == '\0');
      g_assert_true (*unit == '\0' || si == 7.25);
    }
  g_assert_cmpstr (hl_dimension_json_suffix (HL_DIMENSION_ENTROPY), ==, "_J_kgK");
  g_assert_cmpstr (hl_dimension_json_suffix (HL_DIMENSION_MASS_FLOW), ==, "_kg_s");
  g_assert_cmpstr (hl_dimension_json_suffix (HL_DIMENSION_RATIO), ==, "");
}

int
main (int argc, char **argv)
{
  g_test_init (&argc, &argv, NULL);
  g_test_add_func ("/units/factors-agree-with-sp811", test_factors_agree_with_sp811);
  g_test_add_func ("/units/differences-have-no-offset", test_differences_have_no_offset);
  g_test_add_func ("/units/gauge-pressure-counts-from-the-site", test_gauge_pressure_counts_from_the_site);
  g_test_add_func ("/units/bare-numbers-take-the-unit-of-the-set", test_bare_numbers_take_the_unit_of_the_set);
  g_test_add_func ("/units/rounding", test_rounding);
  g_test_add_func ("/units/number-alone-fits-the-label", test_number_alone_fits_the_label);
  g_test_add_func ("/units/exact-text-is-short", test_exact_text_is_short);
  g_test_add_func ("/units/typed-numbers-stay-neat", test_typed_numbers_stay_neat);
  g_test_add_func ("/units/round-trips", test_round_trips);
  g_test_add_func ("/units/numbers-for-files", test_numbers_for_files);
  g_test_add_func ("/units/ids-and-names", test_ids_and_names);
  return g_test_run ();
}
