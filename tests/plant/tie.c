/* Ties and arithmetic: what is read, what is refused, and canonical texts.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "plant/plant-private.h"
#include "plant/tie-private.h"
#include "plant-test.h"

/* Values of the quantities that the rows name, in SI: any will do. */
static double
number_of (const HlAddress *address)
{
  static const struct { const char *text; double value; } rows[] = {
    { "B1.steam.p", 65e5 }, { "C1.steam.p", 7000 }, { "D1.steam.p", 5e5 }, { "T1.inlet.p", 62e5 }, { "T1.exhaust.T", 312.15 }, { "C1.condensate.T", 310.0 },
    { "m:2", 12.0 }, { "live.m", 12.5 }, { "plant.net_power", 12e6 }, { "T1.group_efficiency1", 0.85 }, { "T1.exhaust.h", 2.2e6 }, { "B1.steam.h", 3.4e6 },
    { "B1.feed.h", 0.6e6 }, { "T1.exhaust.s", 7e3 }, { "C1.heat", 25e6 }, { "B1.heat", 36e6 }, { "C1.subcooling", 2.0 }, { "P1.isentropic_efficiency", 0.75 },
  };
  g_autofree char *text = hl_address_to_text (address);
  for (gsize i = 0; i < G_N_ELEMENTS (rows); i++)
    if (g_str_equal (rows[i].text, text))
      return rows[i].value;
  g_error ("no number for %s", text);
}

static double
evaluate (const HlTie *tie)
{
  double of[20], value;
  for (guint k = 0; k < hl_tie_n_of (tie); k++)
    of[k] = number_of (hl_tie_of (tie, k));
  g_assert_true (hl_tie_evaluate (tie, of, &value, NULL));
  return value;
}

/* What is read, its value in SI, and how it is shown and filed. */
static void
test_ties (void)
{
  static const struct { const char *address, *text; double si; const char *shown, *in_file; } rows[] = {
    { "T1.exhaust.p", "=0.23*B1.steam.p", 0.23 * 65e5, "0.23*B1.steam.p", "0.23*B1.steam.p" },
    { "T1.exhaust.p", "= B1.steam.p * 0.23", 0.23 * 65e5, "B1.steam.p*0.23", "B1.steam.p*0.23" },
    { "T1.exhaust.p", "=B1.steam.p/4", 65e5 / 4, "B1.steam.p/4", "B1.steam.p/4" },
    { "T1.exhaust.p", "=23 % * B1.steam.p", 0.23 * 65e5, "0.23*B1.steam.p", "0.23*B1.steam.p" },
    { "T1.inlet.T", "=T1.exhaust.T - 5 K", 307.15, "T1.exhaust.T - 5 K", "T1.exhaust.T-5" },
    { "T1.inlet.T", "=T1.exhaust.T - 5 °C", 307.15, "T1.exhaust.T - 5 K", "T1.exhaust.T-5" },
    { "T1.inlet.T", "=T1.exhaust.T - 9 °F", 307.15, "T1.exhaust.T - 5 K", "T1.exhaust.T-5" },
    { "T1.inlet.T", "=T1.exhaust.T − 5", 307.15, "T1.exhaust.T - 5 K", "T1.exhaust.T-5" },
    { "T1.inlet.T", "=T1.exhaust.T + -5 K", 307.15, "T1.exhaust.T - 5 K", "T1.exhaust.T-5" },
    { "T1.inlet.T", "=20 °C + T1.exhaust.T", 332.15, "20 K + T1.exhaust.T", "20+T1.exhaust.T" },
    { "T1.inlet.p", "=2*C1.steam.p + 0.1 bar", 24000, "2*C1.steam.p + 0.1 bar", "2*C1.steam.p+10000" },
    { "T1.inlet.p", "=2*C1.steam.p + 0.1", 24000, "2*C1.steam.p + 0.1 bar", "2*C1.steam.p+10000" },
    { "T1.inlet.p", "=2*(C1.steam.p + 5 kPa)", 24000, "2*(C1.steam.p + 0.05 bar)", "2*(C1.steam.p+5000)" },
    { "T1.inlet.p", "=-(C1.steam.p) + 0,1 bar", 3000, "-C1.steam.p + 0.1 bar", "-C1.steam.p+10000" },
    { "T1.inlet.p", "=3*C1.steam.p - C1.steam.p", 14000, "3*C1.steam.p - C1.steam.p", "3*C1.steam.p-C1.steam.p" },
    { "m:3", "=m:2", 12, "m:2", "m:2" },
    { "m:3", "=0.5*stream:2.m", 6, "0.5*m:2", "0.5*m:2" },
    { "m:3", "=live.m+3.6 t/h", 13.5, "live.m + 1 kg/s", "live.m+1" },
    { "P2.pressure_rise", "=0.1*B1.steam.p", 65e4, "0.1*B1.steam.p", "0.1*B1.steam.p" },
    { "plant.gross_power", "=1.05*plant.net_power + 40 kW", 12.64e6, "1.05*plant.net_power + 40 kW", "1.05*plant.net_power+40000" },
    { "T1.isentropic_efficiency", "=T1.group_efficiency1 - 2 %", 0.83, "T1.group_efficiency1 - 0.02", "T1.group_efficiency1-0.02" },
    { "B1.steam.h", "=1e-1*T1.exhaust.h", 2.2e5, "0.1*T1.exhaust.h", "0.1*T1.exhaust.h" },
    { "B1.steam.s", "=(T1.exhaust.s + 2 kJ/(kg K))", 9000, "T1.exhaust.s + 2 kJ/(kg K)", "T1.exhaust.s+2000" },
    /* Several quantities. */
    { "plant.heat_rejected", "=B1.heat - plant.net_power", 24e6, "B1.heat - plant.net_power", "B1.heat-plant.net_power" },
    { "P1.outlet.p", "=(B1.steam.p+20 bar)/2", 42.5e5, "(B1.steam.p + 20 bar)/2", "(B1.steam.p+2000000)/2" },
    { "P1.outlet.p", "=B1.steam.p - (C1.steam.p + D1.steam.p)", 5993000, "B1.steam.p - (C1.steam.p + D1.steam.p)", "B1.steam.p-(C1.steam.p+D1.steam.p)" },
    { "P1.outlet.p", "=B1.steam.p - C1.steam.p + D1.steam.p", 6993000, "B1.steam.p - C1.steam.p + D1.steam.p", "B1.steam.p-C1.steam.p+D1.steam.p" },
    { "P1.outlet.p", "=sqrt(B1.steam.p*C1.steam.p)", 213307.29, "sqrt(B1.steam.p*C1.steam.p)", "sqrt(B1.steam.p*C1.steam.p)" },
    { "P1.outlet.p", "=max(C1.steam.p; 0.2 bar)", 20000, "max(C1.steam.p; 0.2 bar)", "max(C1.steam.p;20000)" },
    { "P1.outlet.p", "=max(C1.steam.p, D1.steam.p, 2)", 5e5, "max(C1.steam.p; D1.steam.p; 2 bar)", "max(C1.steam.p;D1.steam.p;200000)" },
    { "P1.outlet.p", "=2*min(C1.steam.p; 0.2 barg)", 14000, "2*min(C1.steam.p; 1.2060628393657808 bar)", "2*min(C1.steam.p;120606.28393657808)" },
    { "T1.inlet.T", "=max(T1.exhaust.T; 60 °C)", 333.15, "max(T1.exhaust.T; 60 °C)", "max(T1.exhaust.T;333.15)" },
    { "T1.inlet.T", "=max(T1.exhaust.T; 60)", 333.15, "max(T1.exhaust.T; 60 °C)", "max(T1.exhaust.T;333.15)" },
    { "T1.inlet.T", "=(T1.exhaust.T + C1.condensate.T)/2", 311.075, "(T1.exhaust.T + C1.condensate.T)/2", "(T1.exhaust.T+C1.condensate.T)/2" },
    { "T1.inlet.T", "=T1.exhaust.T + 2*(T1.exhaust.T - C1.condensate.T)", 316.45, "T1.exhaust.T + 2*(T1.exhaust.T - C1.condensate.T)", "T1.exhaust.T+2*(T1.exhaust.T-C1.condensate.T)" },
    { "T1.inlet.T", "=40 °C + C1.subcooling", 315.15, "40 °C + C1.subcooling", "313.15+C1.subcooling" },
    { "T1.inlet.T", "=0.9*T1.exhaust.T", 0.9 * 312.15, "0.9*T1.exhaust.T", "0.9*T1.exhaust.T" },
    { "C1.subcooling", "=T1.exhaust.T - 20 °C", 19, "T1.exhaust.T - 20 °C", "T1.exhaust.T-293.15" },
    { "C1.subcooling", "=45 °C - T1.exhaust.T", 6, "45 °C - T1.exhaust.T", "318.15-T1.exhaust.T" },
    { "C1.subcooling", "=T1.exhaust.T - C1.condensate.T", 2.15, "T1.exhaust.T - C1.condensate.T", "T1.exhaust.T-C1.condensate.T" },
    { "C1.subcooling", "=max(T1.exhaust.T - C1.condensate.T; 3 °C)", 3, "max(T1.exhaust.T - C1.condensate.T; 3 K)", "max(T1.exhaust.T-C1.condensate.T;3)" },
    { "m:3", "=C1.heat/(B1.steam.h - B1.feed.h)", 25e6 / 2.8e6, "C1.heat/(B1.steam.h - B1.feed.h)", "C1.heat/(B1.steam.h-B1.feed.h)" },
    { "m:3", "=C1.heat/(4.19 kJ/(kg K)*10 K)", 25e6 / 41900, "C1.heat/41.9 kJ/kg", "C1.heat/41900 J/kg" },
    { "plant.net_power", "=live.m*(B1.steam.h - T1.exhaust.h)", 15e6, "live.m*(B1.steam.h - T1.exhaust.h)", "live.m*(B1.steam.h-T1.exhaust.h)" },
    { "T1.isentropic_efficiency", "=plant.net_power/B1.heat", 1.0 / 3.0, "plant.net_power/B1.heat", "plant.net_power/B1.heat" },
    { "T1.isentropic_efficiency", "=sqrt(T1.group_efficiency1*P1.isentropic_efficiency)", 0.798435971, "sqrt(T1.group_efficiency1*P1.isentropic_efficiency)", "sqrt(T1.group_efficiency1*P1.isentropic_efficiency)" },
    { "T1.isentropic_efficiency", "=-(1 - 2*T1.group_efficiency1)", 0.7, "-(1 - 2*T1.group_efficiency1)", "-(1-2*T1.group_efficiency1)" },
    { "T1.isentropic_efficiency", "=T1.group_efficiency1/(1 + 2*3 %)", 0.85 / 1.06, "T1.group_efficiency1/1.06", "T1.group_efficiency1/1.06" },
  };
  g_autoptr (HlPlant) plant = loop_plant ();
  for (gsize i = 0; i < G_N_ELEMENTS (rows); i++)
    {
      HlAddress a = address (plant, rows[i].address);
      HlValue value, again;
      GError *error = NULL;
      g_autofree char *shown = NULL, *in_file = NULL;
      hl_value_parse (plant, &a, rows[i].text, &value, &error);
      g_assert_no_error (error);
      g_assert_cmpint (value.origin, ==, HL_ORIGIN_TIED);
      assert_close (evaluate (value.tie), rows[i].si, 1e-8);
      shown = hl_tie_format (plant, &a, &value);
      in_file = hl_tie_to_text (&value);
      g_assert_cmpstr (in_file, ==, rows[i].in_file);
      g_assert_cmpstr (shown, ==, rows[i].shown);
      /* What is shown can be typed again, and the file's text is read as the same. */
      hl_tie_parse (plant, &a, shown, &again, &error);
      g_assert_no_error (error);
      g_assert_true (again.tie == value.tie);
      g_assert_true (hl_tie_read (plant, &a, in_file, TRUE, &again, &error));
      g_assert_true (again.tie == value.tie);
    }
}

/* Each derivative against a difference of values. */
static void
test_derivatives (void)
{
  static const struct { const char *address, *text; } rows[] = {
    { "P1.outlet.p", "=0.3*B1.steam.p - 2*C1.steam.p + 1 bar" },
    { "P1.outlet.p", "=sqrt(B1.steam.p*C1.steam.p)/2 + max(C1.steam.p; D1.steam.p) - min(C1.steam.p; D1.steam.p)" },
    { "m:3", "=C1.heat/(B1.steam.h - B1.feed.h) + live.m" },
    { "T1.isentropic_efficiency", "=-(1 - 2*T1.group_efficiency1*T1.group_efficiency1)/P1.isentropic_efficiency" },
  };
  g_autoptr (HlPlant) plant = loop_plant ();
  for (gsize i = 0; i < G_N_ELEMENTS (rows); i++)
    {
      HlAddress a = address (plant, rows[i].address);
      HlValue read;
      double of[8], exact[8], value;
      g_assert_true (hl_value_parse (plant, &a, rows[i].text, &read, NULL));
      for (guint k = 0; k < hl_tie_n_of (read.tie); k++)
        of[k] = number_of (hl_tie_of (read.tie, k));
      g_assert_true (hl_tie_evaluate (read.tie, of, &value, exact));
      for (guint k = 0; k < hl_tie_n_of (read.tie); k++)
        {
          double here = of[k], step = 1e-5 * here, more, less;
          of[k] = here + step;
          g_assert_true (hl_tie_evaluate (read.tie, of, &more, NULL));
          of[k] = here - step;
          g_assert_true (hl_tie_evaluate (read.tie, of, &less, NULL));
          of[k] = here;
          g_assert_cmpfloat_with_epsilon ((more - less) / (2.0 * step) * here / value, exact[k] * here / value, 1e-8);
        }
    }
}

static void
test_linear_or_not (void)
{
  static const struct { const char *address, *text; gboolean is_linear, is_level_free; } rows[] = {
    { "P1.outlet.p", "=(B1.steam.p + 20 bar)/2 - 0.1*C1.steam.p", TRUE, TRUE },
    { "P1.outlet.p", "=max(B1.steam.p; C1.steam.p)", FALSE, TRUE },
    { "T1.isentropic_efficiency", "=T1.group_efficiency1*P1.isentropic_efficiency", FALSE, TRUE },
    { "T1.isentropic_efficiency", "=1/T1.group_efficiency1 - 0.5", FALSE, TRUE },
    { "T1.inlet.T", "=(T1.exhaust.T + C1.condensate.T)/2 + 3 K", TRUE, TRUE },
    { "T1.inlet.T", "=0.9*T1.exhaust.T", TRUE, FALSE },
    { "C1.subcooling", "=T1.exhaust.T - C1.condensate.T", TRUE, TRUE },
    { "C1.subcooling", "=T1.exhaust.T - 0.9*C1.condensate.T", TRUE, FALSE },
  };
  g_autoptr (HlPlant) plant = loop_plant ();
  for (gsize i = 0; i < G_N_ELEMENTS (rows); i++)
    {
      HlAddress a = address (plant, rows[i].address);
      HlValue value;
      g_assert_true (hl_value_parse (plant, &a, rows[i].text, &value, NULL));
      g_assert_cmpint (hl_tie_is_linear (value.tie), ==, rows[i].is_linear);
      g_assert_cmpint (hl_tie_is_level_free (value.tie), ==, rows[i].is_level_free);
    }
}

static void
test_formulas (void)
{
  g_autoptr (HlPlant) plant = loop_plant ();
  HlAddress p = address (plant, "P1.outlet.p");
  HlValue value;
  g_assert_true (hl_value_parse (plant, &p, "=max(-2*(C1.steam.p + 0.1 bar)/3; B1.steam.p - C1.steam.p)", &value, NULL));
  g_autofree char *si = hl_tie_formula (value.tie, TRUE, HL_UNITS_METRIC), *words = hl_tie_formula (value.tie, FALSE, HL_UNITS_METRIC);
  g_assert_cmpstr (si, ==, "max(-2 × ({1} + 10000) ÷ 3, {2} − {1})");
  g_assert_cmpstr (words, ==, "max(−2 × ({1} + 0.1 bar) ÷ 3, {2} − {1})");
}

/* Each dimension but the plain numbers has units, so that none is mistaken for a ratio. */
static void
test_every_dimension_has_units (void)
{
  for (guint k = 0; k < HL_N_DIMENSIONS; k++)
    g_assert_cmpint (hl_base_is_none (hl_dimension_base ((HlDimension) k)), ==,
                     k == HL_DIMENSION_RATIO || k == HL_DIMENSION_HEAT_RATE || k == HL_DIMENSION_COUNT);
}

/* A file may name what has vanished; a person may not. */
static void
test_what_has_vanished (void)
{
  g_autoptr (HlPlant) plant = loop_plant ();
  HlAddress p = address (plant, "T1.inlet.p");
  HlValue value;
  GError *error = NULL;
  g_assert_true (hl_tie_read (plant, &p, "0.5*(Z9.steam.p+20000)", TRUE, &value, &error));
  g_assert_no_error (error);
  g_autofree char *in_file = hl_tie_to_text (&value), *shown = hl_tie_format (plant, &p, &value);
  g_assert_cmpstr (in_file, ==, "0.5*(Z9.steam.p+20000)");
  g_assert_cmpstr (shown, ==, "0.5*(Z9.steam.p + 0.2 bar)");
  g_assert_false (hl_tie_read (plant, &p, "0.5*Z9.steam.p", FALSE, &value, &error));
  assert_message (&error, "there is no component “Z9”");
  g_assert_false (hl_tie_read (plant, &p, "0.5*Z9", TRUE, &value, &error));
  assert_message (&error, "write component.quantity");
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
    { "T1.inlet.p", "=2 kg/s", "that is a mass flow, but a pressure is wanted" },
    { "T1.inlet.p", "=2 mpa", "may mean" },
    { "T1.inlet.p", "=2 inHg vac", "write the absolute pressure" },
    { "T1.inlet.p", "=1,234 bar", "thousands" },
    { "T1.inlet.p", "=Z9.steam.p", "there is no component “Z9”" },
    { "T1.inlet.p", "=T1.inlet.p", "that is the same quantity; tie it to another" },
    { "T1.inlet.p", "=0.5*B1.steam.p", "that is the same quantity" },
    { "T1.inlet.p", "=0.5*p:live", "that is the same quantity" },
    { "T1.inlet.p", "=m:2", "that comes out as a mass flow, but a pressure is wanted; tie like to like" },
    { "T1.inlet.p", "=C1.steam.p*C1.steam.p", "that comes out as a number in kg2/(m2 s4), but a pressure is wanted" },
    { "T1.inlet.p", "=2 bar*C1.steam.p", "that comes out as a number in kg2/(m2 s4), but a pressure is wanted" },
    { "T1.inlet.p", "=C1.steam.p + m:2", "a pressure and a mass flow cannot be added; both must be of one kind" },
    { "T1.inlet.p", "=C1.steam.p - m:2", "a mass flow cannot be subtracted from a pressure" },
    { "T1.inlet.p", "=C1.steam.p + 2 %", "a pressure and a ratio cannot be added" },
    { "T1.inlet.p", "=C1.steam.p*C1.steam.p/(2 + C1.steam.p*C1.steam.p)", "a number without unit cannot be added to a number in kg2/(m2 s4)" },
    { "T1.inlet.p", "=max(C1.steam.p; m:2)", "a pressure and a mass flow cannot be compared" },
    { "T1.inlet.p", "=max(C1.steam.p)", "min and max take two values or more" },
    { "T1.inlet.p", "=sqrt(C1.steam.p; 2)", "sqrt takes one value" },
    { "T1.inlet.p", "=sqrt(sqrt(sqrt(C1.steam.p)))", "that root has no unit" },
    { "T1.inlet.p", "=sqrt(-2)*C1.steam.p", "a number below zero has no root" },
    { "T1.inlet.p", "=mean(C1.steam.p; 2)", "there is no function “mean”; there are min, max and sqrt" },
    { "T1.inlet.p", "=max(C1.steam.p; 2", "closing bracket is missing" },
    { "T1.inlet.p", "=B1.steam.p + D1.steam.p - T1.inlet.p", "that is the same quantity" },
    { "T1.inlet.T", "=(T1.exhaust.T + 60 °C)/2", "cannot be negated or multiplied; write it in K" },
    { "T1.inlet.T", "=T1.exhaust.T - C1.condensate.T", "a difference of temperatures, but a temperature is wanted; add it to one" },
    { "C1.subcooling", "=T1.exhaust.T", "comes out as a temperature, but a difference of temperatures is wanted; subtract another one" },
    { "T1.inlet.T", "=T1.exhaust.T + C1.condensate.T - 20 °C", "whether °C is a temperature or a difference here; write it in K" },
    { "m:3", "=C1.heat/(T1.exhaust.T - 20 °C)", "cannot be negated or multiplied; write it in K" },
    { "T1.inlet.p", "=C1.steam.p*max(1,2)", "min and max take two values or more" },
    { "T1.inlet.p", "=1/C1.steam.p", "that comes out as a number in m s2/(kg), but a pressure is wanted" },
    { "T1.inlet.p", "=C1.steam.p/0", "division by zero" },
    { "T1.inlet.p", "=0*C1.steam.p", "a factor of 0 leaves nothing of what it multiplies" },
    { "T1.inlet.p", "=1e300*1e300*C1.steam.p", "a number in it grows too large" },
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
  g_assert_cmpstr (value.tie->text, ==, "T1.exhaust.T-5");
  g_assert_true (hl_value_parse (us, &T, "=900", &value, &error));
  assert_close (value.value, 755.37222222222226, 1e-15);
  g_assert_true (hl_tie_read (us, &T, "T1.exhaust.T-9", TRUE, &value, &error));
  g_assert_cmpstr (value.tie->text, ==, "T1.exhaust.T-9");
  shown = hl_tie_format (us, &T, &value);
  g_assert_cmpstr (shown, ==, "T1.exhaust.T - 16.2 °F");
  g_assert_no_error (error);
}

/* Any text: an error or a checked value, never a crash. */
static void
test_random_texts (void)
{
  static const char *const pieces[] = { "T1.exhaust.T", "C1.condensate.T", "max(", "sqrt(", ";", "60 °C", "m:2", "(", ")", "+", "-", "*", "/", "5", "0.2", "1,5", "K", "°C", " bar", " ", "%", "e3", ".", ":", "x", "plant.net_power" };
  g_autoptr (HlPlant) plant = loop_plant ();
  HlAddress T = address (plant, "T1.inlet.T");
  GRand *rand = g_rand_new_with_seed (5);
  int n_ties = 0;
  for (int n = 0; n < 50000; n++)
    {
      g_autoptr (GString) text = g_string_new ("=");
      HlValue value;
      GError *error = NULL;
      for (int i = g_rand_int_range (rand, 0, 8); i > 0; i--)
        g_string_append (text, pieces[g_rand_int_range (rand, 0, G_N_ELEMENTS (pieces))]);
      if (hl_value_parse (plant, &T, text->str, &value, &error))
        {
          HlValue again;
          if (value.origin != HL_ORIGIN_TIED)
            g_assert_true (value.value > 0.0 && value.value <= 3000.0);
          else if (!hl_tie_read (plant, &T, value.tie->text, TRUE, &again, &error) || again.tie != value.tie)
            g_error ("“%s” was kept as “%s”: %s", text->str, value.tie->text, error != NULL ? error->message : again.tie->text);
          else
            n_ties++;
        }
      else
        g_assert_nonnull (error);
      g_clear_error (&error);
    }
  g_assert_cmpint (n_ties, >, 500);
  g_rand_free (rand);
}

int
main (int argc, char **argv)
{
  g_test_init (&argc, &argv, NULL);
  g_test_add_func ("/tie/ties", test_ties);
  g_test_add_func ("/tie/derivatives", test_derivatives);
  g_test_add_func ("/tie/linear-or-not", test_linear_or_not);
  g_test_add_func ("/tie/formulas", test_formulas);
  g_test_add_func ("/tie/every-dimension-has-units", test_every_dimension_has_units);
  g_test_add_func ("/tie/what-has-vanished", test_what_has_vanished);
  g_test_add_func ("/tie/constants", test_constants);
  g_test_add_func ("/tie/refusals", test_refusals);
  g_test_add_func ("/tie/unit-sets", test_unit_sets);
  g_test_add_func ("/tie/random-texts", test_random_texts);
  return g_test_run ();
}
