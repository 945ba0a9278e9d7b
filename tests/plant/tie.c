/* Ties and arithmetic: what is read, what is refused, and canonical texts.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "plant/plant-private.h"
#include "plant-test.h"

static void
test_ties (void)
{
  static const struct { const char *address, *text, *of; double factor, offset; const char *shown, *in_file; } rows[] = {
    { "T1.exhaust.p", "=0.23*B1.steam.p", "B1.steam.p", 0.23, 0, "0.23*B1.steam.p", "0.23*B1.steam.p" },
    { "T1.exhaust.p", "= B1.steam.p * 0.23", "B1.steam.p", 0.23, 0, "0.23*B1.steam.p", "0.23*B1.steam.p" },
    { "T1.exhaust.p", "=B1.steam.p/4", "B1.steam.p", 0.25, 0, "0.25*B1.steam.p", "0.25*B1.steam.p" },
    { "T1.exhaust.p", "=23 % * B1.steam.p", "B1.steam.p", 0.23, 0, "0.23*B1.steam.p", "0.23*B1.steam.p" },
    { "T1.inlet.T", "=T1.exhaust.T - 5 K", "T1.exhaust.T", 1, -5, "T1.exhaust.T - 5 K", "T1.exhaust.T-5" },
    { "T1.inlet.T", "=T1.exhaust.T - 5 °C", "T1.exhaust.T", 1, -5, "T1.exhaust.T - 5 K", "T1.exhaust.T-5" },
    { "T1.inlet.T", "=T1.exhaust.T - 9 °F", "T1.exhaust.T", 1, -5, "T1.exhaust.T - 5 K", "T1.exhaust.T-5" },
    { "T1.inlet.T", "=T1.exhaust.T − 5", "T1.exhaust.T", 1, -5, "T1.exhaust.T - 5 K", "T1.exhaust.T-5" },
    { "T1.inlet.T", "=20 °C + T1.exhaust.T", "T1.exhaust.T", 1, 20, "T1.exhaust.T + 20 K", "T1.exhaust.T+20" },
    { "T1.inlet.p", "=2*C1.steam.p + 0.1 bar", "C1.steam.p", 2, 1e4, "2*C1.steam.p + 0.1 bar", "2*C1.steam.p+10000" },
    { "T1.inlet.p", "=2*C1.steam.p + 0.1", "C1.steam.p", 2, 1e4, "2*C1.steam.p + 0.1 bar", "2*C1.steam.p+10000" },
    { "T1.inlet.p", "=2*(C1.steam.p + 5 kPa)", "C1.steam.p", 2, 1e4, "2*C1.steam.p + 0.1 bar", "2*C1.steam.p+10000" },
    { "T1.inlet.p", "=-(C1.steam.p) + 0,1 bar", "C1.steam.p", -1, 1e4, "-1*C1.steam.p + 0.1 bar", "-1*C1.steam.p+10000" },
    { "T1.inlet.p", "=C1.steam.p + C1.steam.p", "C1.steam.p", 2, 0, "2*C1.steam.p", "2*C1.steam.p" },
    { "T1.inlet.p", "=3*C1.steam.p - C1.steam.p", "C1.steam.p", 2, 0, "2*C1.steam.p", "2*C1.steam.p" },
    { "m:3", "=m:2", "m:2", 1, 0, "m:2", "m:2" },
    { "m:3", "=0.5*stream:2.m", "m:2", 0.5, 0, "0.5*m:2", "0.5*m:2" },
    { "m:3", "=live.m+3.6 t/h", "live.m", 1, 1, "live.m + 1 kg/s", "live.m+1" },
    { "P2.pressure_rise", "=0.1*B1.steam.p", "B1.steam.p", 0.1, 0, "0.1*B1.steam.p", "0.1*B1.steam.p" },
    { "plant.gross_power", "=1.05*plant.net_power + 40 kW", "plant.net_power", 1.05, 4e4, "1.05*plant.net_power + 40 kW", "1.05*plant.net_power+40000" },
    { "T1.isentropic_efficiency", "=T1.group_efficiency1 - 2 %", "T1.group_efficiency1", 1, -0.02, "T1.group_efficiency1 - 0.02", "T1.group_efficiency1-0.02" },
    { "B1.steam.h", "=1e-1*T1.exhaust.h", "T1.exhaust.h", 0.1, 0, "0.1*T1.exhaust.h", "0.1*T1.exhaust.h" },
    { "B1.steam.s", "=T1.exhaust.s + 2 kJ/(kg K)", "T1.exhaust.s", 1, 2000, "T1.exhaust.s + 2 kJ/(kg K)", "T1.exhaust.s+2000" },
    { "B1.steam.s", "=(T1.exhaust.s + 2 kJ/(kg K))", "T1.exhaust.s", 1, 2000, "T1.exhaust.s + 2 kJ/(kg K)", "T1.exhaust.s+2000" },
  };
  g_autoptr (HlPlant) plant = loop_plant ();
  for (gsize i = 0; i < G_N_ELEMENTS (rows); i++)
    {
      HlAddress a = address (plant, rows[i].address), of = address (plant, rows[i].of);
      HlValue value, again;
      GError *error = NULL;
      g_autofree char *shown = NULL, *in_file = NULL, *retyped = NULL;
      hl_value_parse (plant, &a, rows[i].text, &value, &error);
      g_assert_no_error (error);
      g_assert_cmpint (value.origin, ==, HL_ORIGIN_TIED);
      g_assert_true (hl_address_equal (&value.tie_of, &of));
      g_assert_cmpfloat (value.tie_factor, ==, rows[i].factor);
      assert_close (value.tie_offset, rows[i].offset, 1e-12);
      shown = hl_tie_format (plant, &a, &value);
      in_file = hl_tie_to_text (&value);
      if (value.tie_offset == rows[i].offset)
        {
          g_assert_cmpstr (shown, ==, rows[i].shown);
          g_assert_cmpstr (in_file, ==, rows[i].in_file);
        }
      /* What is shown can be typed again, and the file's text is read as the same. */
      g_assert_true (hl_tie_parse (plant, &a, shown, &again, &error));
      g_assert_cmpfloat (again.tie_offset, ==, value.tie_offset);
      g_assert_cmpfloat (again.tie_factor, ==, value.tie_factor);
      g_assert_true (hl_tie_read (plant, &a, in_file, TRUE, &again, &error));
      g_assert_cmpfloat (again.tie_offset, ==, value.tie_offset);
      g_assert_cmpfloat (again.tie_factor, ==, value.tie_factor);
    }
}

/* Arithmetic on numbers only is a given value. */
static void
test_constants (void)
{
  static const struct { const char *address, *text; double si; } rows[] = {
    { "T1.inlet.p", "80 bar", 80e5 },
    { "T1.inlet.p", " 80 ", 80e5 },
    { "T1.inlet.p", "=80 bar", 80e5 },
    { "T1.inlet.p", "=0.25*168 bar", 42e5 },
    { "T1.inlet.p", "=0.25*168", 42e5 },
    { "T1.inlet.p", "=168 bar/4", 42e5 },
    { "T1.inlet.p", "=168 bar - 4 bar*2 + 1", 161e5 },
    { "T1.inlet.p", "=7 barg + 1 bar", 8e5 + 100606.28393657808 },
    { "T1.inlet.T", "=480 °C", 753.15 },
    { "T1.inlet.T", "=480 °C + 5 K", 758.15 },
    { "T1.inlet.T", "=480 °C - 5 °C", 748.15 },
    { "T1.inlet.T", "=480 °C - 9 °F", 748.15 },
    { "T1.inlet.T", "=2*300 K", 600 },
    { "T1.inlet.T", "=480", 753.15 },
    { "C1.subcooling", "=2*1.5 °C", 3 },
    { "C1.subcooling", "=9 °F", 5 },
    { "T1.isentropic_efficiency", "=80 % + 3 %", 0.83 },
    { "T1.isentropic_efficiency", "83 %", 0.83 },
    { "plant.net_power", "=3*4 MW", 12e6 },
    { "m:3", "=(1 + 2)*(3 kg/s)", 9 },
  };
  g_autoptr (HlPlant) plant = loop_plant ();
  for (gsize i = 0; i < G_N_ELEMENTS (rows); i++)
    {
      HlAddress a = address (plant, rows[i].address);
      HlValue value;
      GError *error = NULL;
      hl_value_parse (plant, &a, rows[i].text, &value, &error);
      g_assert_no_error (error);
      g_assert_cmpint (value.origin, ==, HL_ORIGIN_GIVEN);
      assert_close (value.value, rows[i].si, 1e-15);
    }
}

static void
test_refusals (void)
{
  static const struct { const char *address, *text, *says; } rows[] = {
    { "T1.inlet.p", "=", "missing at the end" },
    { "T1.inlet.p", "=2*", "missing at the end" },
    { "T1.inlet.p", "=*2", "must stand before “*2”" },
    { "T1.inlet.p", "=(2 bar", "closing bracket is missing" },
    { "T1.inlet.p", "=2 bar)", "“)” is not understood" },
    { "T1.inlet.p", "=2 bar 3 bar", "is not understood" },
    { "T1.inlet.p", "=2 bra", "the unit “bra” is not known" },
    { "T1.inlet.p", "=2 kg/s", "kg/s is a unit of mass flow, but a pressure is wanted" },
    { "T1.inlet.p", "=2 mpa", "may mean" },
    { "T1.inlet.p", "=2 inHg vac", "write the absolute pressure" },
    { "T1.inlet.p", "=1,234 bar", "thousands" },
    { "T1.inlet.p", "=Z9.steam.p", "there is no component “Z9”" },
    { "T1.inlet.p", "=T1.inlet.p", "that is the same quantity; tie it to another" },
    { "T1.inlet.p", "=0.5*B1.steam.p", "that is the same quantity" },
    { "T1.inlet.p", "=0.5*p:live", "that is the same quantity" },
    { "T1.inlet.p", "=m:2", "one is a pressure, the other a mass flow; tie like to like" },
    { "T1.inlet.p", "=C1.steam.p*C1.steam.p", "two quantities cannot be multiplied" },
    { "T1.inlet.p", "=2 bar*C1.steam.p", "two quantities cannot be multiplied" },
    { "T1.inlet.p", "=C1.steam.p + D1.steam.p", "two quantities cannot be added" },
    { "T1.inlet.p", "=1/C1.steam.p", "only a plain number may stand behind “/”" },
    { "T1.inlet.p", "=C1.steam.p/0", "division by zero" },
    { "T1.inlet.p", "=0*C1.steam.p", "a finite factor other than 0" },
    { "T1.inlet.p", "=C1.steam.p - C1.steam.p", "a finite factor other than 0" },
    { "T1.inlet.p", "=1e300*1e300*C1.steam.p", "a finite factor other than 0" },
    { "T1.inlet.p", "=C1.steam.p + 0.1 barg", "barg counts from the ambient pressure" },
    { "T1.inlet.p", "=0.1 barg + C1.steam.p", "barg counts from the ambient pressure" },
    { "T1.inlet.p", "=2*1 barg", "cannot be negated or multiplied" },
    { "T1.inlet.T", "=2*20 °C", "cannot be negated or multiplied" },
    { "T1.inlet.T", "=-(20 °C)", "cannot be negated or multiplied" },
    { "T1.inlet.T", "=5 K + 20 °C", "write the temperature first" },
    { "T1.inlet.T", "=-300 °C", "must lie above absolute zero" },
    { "P1.pressure_rise", "=2 barg", "a difference of pressures is neither" },
    { "T1.isentropic_efficiency", "=0.7*2", "must lie above 0 and be at most 1" },
    { "T1.isentropic_efficiency", "1.4", "must lie above 0 and be at most 1" },
    { "T1.inlet.p", "abc", "a number must stand first" },
    { "T1.inlet.p", "=\xff", "not UTF-8" },
    { "T1.inlet.p", "=((((((((((((((((((((((((((((((((((1 bar))))))))))))))))))))))))))))))))))", "too many brackets" },
  };
  g_autoptr (HlPlant) plant = loop_plant ();
  HlAddress inlet = address (plant, "T1.inlet.p"), unknown = hl_address_component ("Z9", "p");
  HlValue value = { .origin = HL_ORIGIN_FOUND };
  GError *error = NULL;
  g_autofree char *longest = g_strnfill (1000, '1');
  g_autofree char *long_tie = g_strconcat ("=", longest, NULL);
  for (gsize i = 0; i < G_N_ELEMENTS (rows); i++)
    {
      HlAddress a = address (plant, rows[i].address);
      if (hl_value_parse (plant, &a, rows[i].text, &value, &error))
        g_error ("“%s” was taken", rows[i].text);
      assert_message (&error, rows[i].says);
    }
  g_assert_false (hl_value_parse (plant, &inlet, long_tie, &value, &error));
  assert_message (&error, "too long");
  g_assert_false (hl_tie_parse (plant, &inlet, "2 bar", &value, &error));
  assert_message (&error, "names no other quantity; a tie is for instance =0.23*B1.steam.p");
  g_assert_false (hl_value_parse (plant, &unknown, "2 bar", &value, &error));
  assert_message (&error, "no quantity Z9.p");
  g_assert_false (hl_value_parse (plant, &unknown, "=2 bar", &value, &error));
  assert_message (&error, "no quantity Z9.p");
  g_assert_cmpint (value.origin, ==, HL_ORIGIN_FOUND);
}

/* Bare numbers follow the plant's units for people, and are SI in files. */
static void
test_unit_sets (void)
{
  g_autoptr (HlPlant) loop = loop_plant (), us = hl_plant_with_units (loop, HL_UNITS_US);
  HlAddress T = address (us, "T1.inlet.T");
  HlValue value;
  GError *error = NULL;
  g_autofree char *shown = NULL;
  g_assert_true (hl_value_parse (us, &T, "=T1.exhaust.T - 9", &value, &error));
  assert_close (value.tie_offset, -5.0, 1e-14);
  g_assert_true (hl_value_parse (us, &T, "=900", &value, &error));
  assert_close (value.value, 755.37222222222226, 1e-15);
  g_assert_true (hl_tie_read (us, &T, "T1.exhaust.T-9", TRUE, &value, &error));
  g_assert_cmpfloat (value.tie_offset, ==, -9.0);
  shown = hl_tie_format (us, &T, &value);
  g_assert_cmpstr (shown, ==, "T1.exhaust.T - 16.2 °F");
  g_assert_no_error (error);
}

/* Any text: an error or a checked value, never a crash. */
static void
test_random_texts (void)
{
  static const char *const pieces[] = { "T1.exhaust.T", "m:2", "(", ")", "+", "-", "*", "/", "5", "0.2", "1,5", "K", "°C", " bar", " ", "%", "e3", ".", ":", "x", "plant.net_power" };
  g_autoptr (HlPlant) plant = loop_plant ();
  HlAddress T = address (plant, "T1.inlet.T");
  GRand *rand = g_rand_new_with_seed (5);
  for (int n = 0; n < 50000; n++)
    {
      g_autoptr (GString) text = g_string_new ("=");
      HlValue value;
      GError *error = NULL;
      for (int i = g_rand_int_range (rand, 0, 8); i > 0; i--)
        g_string_append (text, pieces[g_rand_int_range (rand, 0, G_N_ELEMENTS (pieces))]);
      if (hl_value_parse (plant, &T, text->str, &value, &error))
        g_assert_true (value.origin == HL_ORIGIN_TIED ? isfinite (value.tie_factor) && isfinite (value.tie_offset)
                                                      : value.value > 0.0 && value.value <= 3000.0);
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
  g_test_add_func ("/tie/ties", test_ties);
  g_test_add_func ("/tie/constants", test_constants);
  g_test_add_func ("/tie/refusals", test_refusals);
  g_test_add_func ("/tie/unit-sets", test_unit_sets);
  g_test_add_func ("/tie/random-texts", test_random_texts);
  return g_test_run ();
}
