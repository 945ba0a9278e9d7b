/* Plants: reading, look-ups, states known at three addresses.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "plant-test.h"

static void
test_new_plant_is_empty_and_metric (void)
{
  g_autoptr (HlPlant) plant = hl_plant_new ();
  HlAddress net = hl_address_plant ("net_power");
  g_assert_cmpuint (hl_plant_n_components (plant), ==, 0);
  g_assert_cmpuint (hl_plant_n_streams (plant), ==, 0);
  g_assert_cmpuint (hl_plant_n_shafts (plant), ==, 0);
  g_assert_cmpint (hl_plant_units (plant), ==, HL_UNITS_METRIC);
  g_assert_cmpstr (hl_plant_formulation (plant), ==, "if97");
  g_assert_cmpstr (hl_plant_title (plant), ==, "");
  g_assert_cmpfloat (hl_plant_site_pressure (plant), ==, 101325.0);
  g_assert_cmpfloat (hl_plant_value (plant, &net)->value, ==, 10e6);
  g_assert_cmpuint (hl_plant_n_assumed (plant), ==, 2);
  g_assert_null (hl_plant_find_component (plant, "T1"));
  g_assert_cmpint (hl_plant_stream_index (plant, "1"), ==, -1);
}

static void
test_look_ups (void)
{
  g_autoptr (HlPlant) plant = loop_plant ();
  HlAddress a = address (plant, "T1.inlet.p"), none = hl_address_component ("Z9", "p"), nothing = hl_address_stream ("99", "p");
  g_assert_cmpuint (hl_plant_n_components (plant), ==, 7);
  g_assert_cmpint (hl_plant_component_index (plant, "G1"), ==, 2);
  g_assert_cmpstr (hl_plant_component (plant, 2)->id, ==, "G1");
  g_assert_cmpstr (hl_plant_find_component (plant, "B1")->name, ==, "boiler");
  g_assert_cmpint (hl_plant_stream_index (plant, "4"), ==, 3);
  g_assert_cmpstr (hl_plant_stream_at (plant, "T1", "inlet")->id, ==, "live");
  g_assert_cmpstr (hl_plant_stream_at (plant, "B1", "steam")->id, ==, "live");
  g_assert_null (hl_plant_stream_at (plant, "B1", "exhaust"));
  g_assert_null (hl_plant_stream_at (plant, "Z9", "inlet"));
  g_assert_cmpstr (hl_plant_shaft_of (plant, "G1")->id, ==, "S1");
  g_assert_null (hl_plant_shaft_of (plant, "P1"));
  g_assert_cmpfloat (hl_plant_value (plant, &a)->value, ==, 65e5);
  g_assert_null (hl_plant_value (plant, &none));
  g_assert_null (hl_plant_value (plant, &nothing));
  g_assert_null (hl_plant_quantity_kind (plant, &none));
  g_assert_null (hl_plant_quantity_kind (plant, &nothing));
  g_assert_cmpuint (hl_plant_n_assumed (plant), ==, 4);
  g_assert_cmpfloat (hl_plant_site (plant)->altitude, ==, 60.0);
  g_assert_cmpfloat_with_epsilon (hl_plant_site_pressure (plant), 100606.0, 2.0);
}

/* Port, other port and stream name one state. */
static void
test_state_value_is_found_wherever_it_is (void)
{
  static const char *const names[] = { "p:live", "live.p", "B1.steam.p", "T1.inlet.p" };
  g_autoptr (HlPlant) plant = loop_plant ();
  const HlStream *live = hl_plant_find_stream (plant, "live");
  HlAddress where, a;
  const HlValue *value = hl_plant_state_value (plant, live, "p", &where);
  g_assert_cmpfloat (value->value, ==, 65e5);
  g_assert_cmpstr (where.id, ==, "T1");
  g_assert_cmpstr (where.key, ==, "inlet.p");
  value = hl_plant_state_value (plant, live, "T", &where);
  g_assert_cmpfloat (value->value, ==, 758.15);
  g_assert_cmpstr (where.id, ==, "B1");
  value = hl_plant_state_value (plant, hl_plant_find_stream (plant, "4"), "m", &where);
  g_assert_cmpint (value->origin, ==, HL_ORIGIN_TIED);
  g_assert_cmpint (where.owner, ==, HL_OWNER_STREAM);
  g_assert_null (hl_plant_state_value (plant, live, "m", &where));
  for (gsize i = 0; i < G_N_ELEMENTS (names); i++)
    {
      a = address (plant, names[i]);
      g_assert_cmpfloat (hl_plant_value_wherever (plant, &a, &where)->value, ==, 65e5);
      g_assert_cmpstr (where.key, ==, "inlet.p");
    }
  a = address (plant, "plant.net_power");
  g_assert_cmpfloat (hl_plant_value_wherever (plant, &a, NULL)->value, ==, 12e6);
  a = address (plant, "T1.power");
  g_assert_null (hl_plant_value_wherever (plant, &a, NULL));
}

static void
test_descriptions (void)
{
  static const struct { const char *text, *described; } rows[] = {
    { "T1.isentropic_efficiency", "isentropic efficiency of T1" },
    { "T1.extraction1.p", "extraction pressure 1 of T1" },
    { "T1.extraction1.T", "temperature at extraction 1 of T1" },
    { "T1.group_efficiency2", "efficiency of group 2 of T1" },
    { "B1.steam.p", "pressure at steam outlet of B1" },
    { "m:2", "mass flow of stream 2" },
    { "live.T", "temperature of stream live" },
    { "plant.net_power", "net power of the plant" },
    { "plant.net_efficiency_lhv", "net efficiency (LHV) of the plant" },
  };
  g_autoptr (HlPlant) plant = loop_plant ();
  const HlAddress wholes[] = { hl_address_component ("T1", ""), hl_address_stream ("2", ""), hl_address_plant (""),
                               hl_address_component ("T1", "inlet"), hl_address_component ("Z9", "power"), hl_address_component ("T1", "junk") };
  static const char *const described[] = { "T1", "stream 2", "the plant", "steam inlet of T1", "Z9.power", "T1.junk" };
  for (gsize i = 0; i < G_N_ELEMENTS (rows); i++)
    {
      HlAddress a = address (plant, rows[i].text);
      g_autofree char *text = hl_plant_describe (plant, &a);
      g_assert_cmpstr (text, ==, rows[i].described);
    }
  for (gsize i = 0; i < G_N_ELEMENTS (wholes); i++)
    {
      g_autofree char *text = hl_plant_describe (plant, &wholes[i]);
      g_assert_cmpstr (text, ==, described[i]);
    }
}

int
main (int argc, char **argv)
{
  g_test_init (&argc, &argv, NULL);
  g_test_add_func ("/plant/new-plant-is-empty-and-metric", test_new_plant_is_empty_and_metric);
  g_test_add_func ("/plant/look-ups", test_look_ups);
  g_test_add_func ("/plant/state-value-is-found-wherever-it-is", test_state_value_is_found_wherever_it_is);
  g_test_add_func ("/plant/descriptions", test_descriptions);
  return g_test_run ();
}
