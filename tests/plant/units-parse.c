/* Units: what is refused, and how the refusal reads.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "plant-test.h"

static void
test_bad_texts_are_refused_with_a_mend (void)
{
  static const struct { const char *text; HlDimension dimension; HlUnitsError code; const char *says; } rows[] = {
    { "", HL_DIMENSION_PRESSURE, HL_UNITS_ERROR_NO_NUMBER, "write a number and a unit: bar" },
    { "   ", HL_DIMENSION_COUNT, HL_UNITS_ERROR_NO_NUMBER, "a plain number" },
    { "bar", HL_DIMENSION_PRESSURE, HL_UNITS_ERROR_NO_NUMBER, "a number must stand first" },
    { "abc", HL_DIMENSION_RATIO, HL_UNITS_ERROR_NO_NUMBER, "a number must stand first" },
    { ".", HL_DIMENSION_RATIO, HL_UNITS_ERROR_NO_NUMBER, "a number must stand first" },
    { "-", HL_DIMENSION_RATIO, HL_UNITS_ERROR_NO_NUMBER, "a number must stand first" },
    { "nan", HL_DIMENSION_RATIO, HL_UNITS_ERROR_NO_NUMBER, "a number must stand first" },
    { "inf bar", HL_DIMENSION_PRESSURE, HL_UNITS_ERROR_NO_NUMBER, "a number must stand first" },
    { "0x10 bar", HL_DIMENSION_PRESSURE, HL_UNITS_ERROR_UNKNOWN_UNIT, "x10" },
    { "80 bra", HL_DIMENSION_PRESSURE, HL_UNITS_ERROR_UNKNOWN_UNIT, "“bra” is not known; for a pressure these would do: bar" },
    { "80 bar bar", HL_DIMENSION_PRESSURE, HL_UNITS_ERROR_UNKNOWN_UNIT, "not known" },
    { "80 a-very-long-word-that-is-no-unit-at-all", HL_DIMENSION_PRESSURE, HL_UNITS_ERROR_UNKNOWN_UNIT, "not known" },
    { "80 ()", HL_DIMENSION_PRESSURE, HL_UNITS_ERROR_UNKNOWN_UNIT, "not known" },
    { "3 %", HL_DIMENSION_PRESSURE, HL_UNITS_ERROR_WRONG_DIMENSION, "% is a unit of ratio, but a pressure is wanted" },
    { "80 kg/s", HL_DIMENSION_PRESSURE, HL_UNITS_ERROR_WRONG_DIMENSION, "kg/s is a unit of mass flow, but a pressure is wanted here; these would do: bar" },
    { "5 bar", HL_DIMENSION_TEMPERATURE_DIFFERENCE, HL_UNITS_ERROR_WRONG_DIMENSION, "a temperature difference is wanted" },
    { "5 kg", HL_DIMENSION_COUNT, HL_UNITS_ERROR_UNKNOWN_UNIT, "a plain number" },
    { "1,234 bar", HL_DIMENSION_PRESSURE, HL_UNITS_ERROR_NO_NUMBER, "the comma may separate thousands or decimals; write 1234, or a decimal point" },
    { "-12,345", HL_DIMENSION_COUNT, HL_UNITS_ERROR_NO_NUMBER, "write -12345, or" },
    { "1,234.5 bar", HL_DIMENSION_PRESSURE, HL_UNITS_ERROR_NO_NUMBER, "thousands" },
    { "1.234,5 bar", HL_DIMENSION_PRESSURE, HL_UNITS_ERROR_NO_NUMBER, "one decimal point or comma" },
    { "1.2.3 bar", HL_DIMENSION_PRESSURE, HL_UNITS_ERROR_NO_NUMBER, "one decimal point or comma" },
    { "1'234 bar", HL_DIMENSION_PRESSURE, HL_UNITS_ERROR_NO_NUMBER, "no separators of thousands" },
    { "1 234 bar", HL_DIMENSION_PRESSURE, HL_UNITS_ERROR_NO_NUMBER, "without a space between thousands" },
    { "1e400 bar", HL_DIMENSION_PRESSURE, HL_UNITS_ERROR_NOT_FINITE, "too large" },
    { "1e308 bar", HL_DIMENSION_PRESSURE, HL_UNITS_ERROR_NOT_FINITE, "too large" },
    { "27 inHg vacuum", HL_DIMENSION_PRESSURE, HL_UNITS_ERROR_UNKNOWN_UNIT, "write the absolute pressure" },
    { "27 inHg vac", HL_DIMENSION_PRESSURE, HL_UNITS_ERROR_UNKNOWN_UNIT, "write the absolute pressure" },
    { "12 mW", HL_DIMENSION_POWER, HL_UNITS_ERROR_UNKNOWN_UNIT, "write MW for a million watts" },
    { "12 mw", HL_DIMENSION_POWER, HL_UNITS_ERROR_UNKNOWN_UNIT, "may mean MW or mW" },
    { "12 mpa", HL_DIMENSION_PRESSURE, HL_UNITS_ERROR_UNKNOWN_UNIT, "may mean MPa or mPa" },
    { "12 mPa", HL_DIMENSION_PRESSURE, HL_UNITS_ERROR_UNKNOWN_UNIT, "write MPa" },
    { "12 Mbar", HL_DIMENSION_PRESSURE, HL_UNITS_ERROR_UNKNOWN_UNIT, "write mbar" },
    { "12 MBtu/h", HL_DIMENSION_POWER, HL_UNITS_ERROR_UNKNOWN_UNIT, "write MMBtu/h" },
    { "12 Mlb/h", HL_DIMENSION_MASS_FLOW, HL_UNITS_ERROR_UNKNOWN_UNIT, "write klb/h" },
    { "2 barg", HL_DIMENSION_PRESSURE_DIFFERENCE, HL_UNITS_ERROR_WRONG_DIMENSION, "a difference of pressures is neither" },
    { "2 psia", HL_DIMENSION_PRESSURE_DIFFERENCE, HL_UNITS_ERROR_WRONG_DIMENSION, "a difference of pressures is neither" },
    { "-300 °C", HL_DIMENSION_TEMPERATURE, HL_UNITS_ERROR_IMPOSSIBLE, "below absolute zero" },
    { "-1 K", HL_DIMENSION_TEMPERATURE, HL_UNITS_ERROR_IMPOSSIBLE, "below absolute zero" },
    { "-500 F", HL_DIMENSION_TEMPERATURE, HL_UNITS_ERROR_IMPOSSIBLE, "below absolute zero" },
    { "-1 bar", HL_DIMENSION_PRESSURE, HL_UNITS_ERROR_IMPOSSIBLE, "for a vacuum write the absolute pressure" },
    { "-2 barg", HL_DIMENSION_PRESSURE, HL_UNITS_ERROR_IMPOSSIBLE, "below zero" },
    { "1 \xff bar", HL_DIMENSION_PRESSURE, HL_UNITS_ERROR_NO_NUMBER, "not UTF-8" },
  };
  for (gsize i = 0; i < G_N_ELEMENTS (rows); i++)
    {
      GError *error = NULL;
      double si = 42.0;
      g_assert_false (hl_units_parse (rows[i].text, rows[i].dimension, HL_UNITS_METRIC, 101325.0, &si, &error));
      g_assert_cmpfloat (si, ==, 42.0);
      if (!g_error_matches (error, HL_UNITS_ERROR, rows[i].code))
        g_error ("“%s”: code %d: %s", rows[i].text, error->code, error->message);
      assert_message (&error, rows[i].says);
    }
}

static void
test_long_text_is_refused (void)
{
  g_autofree char *text = g_strnfill (10000, '1');
  GError *error = NULL;
  double si;
  g_assert_false (hl_units_parse (text, HL_DIMENSION_COUNT, HL_UNITS_METRIC, 0.0, &si, &error));
  assert_message (&error, "too long");
}

/* Spellings of one number that people use. */
static void
test_ways_to_write_a_number (void)
{
  static const struct { const char *text; double number; } rows[] = {
    { "12.5", 12.5 }, { "12,5", 12.5 }, { "0,925", 0.925 }, { "1,25", 1.25 }, { "1,2345", 1.2345 }, { "1234,567", 1234.567 },
    { " +3 ", 3 }, { "-3", -3 }, { "−3", -3 }, { ".5", 0.5 }, { "5.", 5 }, { "1e3", 1e3 }, { "1,5E-2", 0.015 }, { "1e+2", 100 },
    { "7\u00a0", 7 },
  };
  for (gsize i = 0; i < G_N_ELEMENTS (rows); i++)
    {
      GError *error = NULL;
      double si = NAN;
      hl_units_parse (rows[i].text, HL_DIMENSION_COUNT, HL_UNITS_METRIC, 0.0, &si, &error);
      g_assert_no_error (error);
      g_assert_cmpfloat (si, ==, rows[i].number);
    }
}

/* Capitals only matter where they change the meaning. */
static void
test_letter_case (void)
{
  static const struct { const char *text; HlDimension dimension; double si; } rows[] = {
    { "1 BAR", HL_DIMENSION_PRESSURE, 1e5 }, { "1 Bar", HL_DIMENSION_PRESSURE, 1e5 }, { "1 kpa", HL_DIMENSION_PRESSURE, 1e3 },
    { "1 KW", HL_DIMENSION_POWER, 1e3 }, { "1 kw", HL_DIMENSION_POWER, 1e3 }, { "36 T/H", HL_DIMENSION_MASS_FLOW, 10 },
    { "1 KJ/KG", HL_DIMENSION_ENTHALPY, 1e3 }, { "80 k", HL_DIMENSION_TEMPERATURE, 80 }, { "1 M", HL_DIMENSION_LENGTH, 1 },
    { "1kg/s", HL_DIMENSION_MASS_FLOW, 1 }, { "1 mbar", HL_DIMENSION_PRESSURE, 100 },
  };
  for (gsize i = 0; i < G_N_ELEMENTS (rows); i++)
    {
      GError *error = NULL;
      double si = NAN;
      hl_units_parse (rows[i].text, rows[i].dimension, HL_UNITS_METRIC, 101325.0, &si, &error);
      g_assert_no_error (error);
      assert_close (si, rows[i].si, 1e-15);
    }
}

/* Any bytes: an error or a finite number, never a crash. */
static void
test_random_texts (void)
{
  static const char letters[] = "0123456789.,-+eE °Cbarg/()%KkmMPWhs\xc2\xb0\xff'";
  GRand *rand = g_rand_new_with_seed (7);
  for (int n = 0; n < 50000; n++)
    {
      char text[24];
      int length = g_rand_int_range (rand, 0, (int) sizeof text - 1);
      double si = NAN;
      GError *error = NULL;
      for (int i = 0; i < length; i++)
        text[i] = letters[g_rand_int_range (rand, 0, (int) sizeof letters - 1)];
      text[length] = '\0';
      if (hl_units_parse (text, (HlDimension) (n % HL_N_DIMENSIONS), (HlUnitSet) (n % HL_N_UNIT_SETS), 101325.0, &si, &error))
        g_assert_true (isfinite (si));
      else
        g_assert_nonnull (error);
      g_clear_error (&error);
    }
  g_rand_free (rand);
}

int
main (int argc, char **argv)
{
  g_test_init (&argc, &argv, NULL);
  g_test_add_func ("/units-parse/bad-texts-are-refused-with-a-mend", test_bad_texts_are_refused_with_a_mend);
  g_test_add_func ("/units-parse/long-text-is-refused", test_long_text_is_refused);
  g_test_add_func ("/units-parse/ways-to-write-a-number", test_ways_to_write_a_number);
  g_test_add_func ("/units-parse/letter-case", test_letter_case);
  g_test_add_func ("/units-parse/random-texts", test_random_texts);
  return g_test_run ();
}
