/* Addresses: grammar, canonical text, and what is refused.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "plant-test.h"

static void
test_grammar (void)
{
  static const struct { const char *text; HlOwner owner; const char *id, *key, *canonical; } rows[] = {
    { "T1.isentropic_efficiency", HL_OWNER_COMPONENT, "T1", "isentropic_efficiency", "T1.isentropic_efficiency" },
    { "T1.inlet.p", HL_OWNER_COMPONENT, "T1", "inlet.p", "T1.inlet.p" },
    { " T1.extraction1.p ", HL_OWNER_COMPONENT, "T1", "extraction1.p", "T1.extraction1.p" },
    { "T1.group_efficiency2", HL_OWNER_COMPONENT, "T1", "group_efficiency2", "T1.group_efficiency2" },
    { "m:2", HL_OWNER_STREAM, "2", "m", "m:2" },
    { "stream:2.m", HL_OWNER_STREAM, "2", "m", "m:2" },
    { "live.T", HL_OWNER_STREAM, "live", "T", "live.T" },
    { "T:live", HL_OWNER_STREAM, "live", "T", "live.T" },
    { "stream:live.T", HL_OWNER_STREAM, "live", "T", "live.T" },
    { "plant.net_power", HL_OWNER_PLANT, "", "net_power", "plant.net_power" },
  };
  g_autoptr (HlPlant) plant = loop_plant ();
  for (gsize i = 0; i < G_N_ELEMENTS (rows); i++)
    for (int with = 0; with <= 1; with++)
      {
        GError *error = NULL;
        HlAddress found, again;
        g_autofree char *text = NULL;
        hl_address_parse (rows[i].text, with ? plant : NULL, &found, &error);
        g_assert_no_error (error);
        g_assert_cmpint (found.owner, ==, rows[i].owner);
        g_assert_cmpstr (found.id, ==, rows[i].id);
        g_assert_cmpstr (found.key, ==, rows[i].key);
        text = hl_address_to_text (&found);
        g_assert_cmpstr (text, ==, rows[i].canonical);
        g_assert_true (hl_address_parse (text, plant, &again, &error));
        g_assert_true (hl_address_equal (&found, &again));
      }
}

static void
test_bad_addresses (void)
{
  static const struct { const char *text; const char *says; } rows[] = {
    { "", "write component.quantity" },
    { "T1", "write component.quantity" },
    { "T9.power", "no component “T9”" },
    { "T1.powr", "T1 (Turbine section) has no quantity “powr”" },
    { "T1.inlet.q", "has no quantity “inlet.q”" },
    { "T1.extraction2.p", "has no quantity “extraction2.p”" },
    { "T1.extraction0.p", "has no quantity" },
    { "T1.group_efficiency3", "has no quantity" },
    { "C1.cooling_rise", "has no quantity" },   /* not modelled in this plant */
    { "m:9", "no stream “9”" },
    { "q:2", "a stream has m, p, T" },
    { "stream:2.q", "a stream has m, p, T" },
    { "stream:2", "write component.quantity" },
    { "dead.p", "no stream “dead”" },
    { "plant.power", "the plant has no quantity “power”" },
    { "1.power", "is no id" },
    { "T-1.power", "is no id" },
    { "T1.po wer", "no name of a quantity" },
    { "T1.", "no name of a quantity" },
    { "m:", "is no id" },
    { "T1.\xff", "not UTF-8" },
  };
  g_autoptr (HlPlant) plant = loop_plant ();
  for (gsize i = 0; i < G_N_ELEMENTS (rows); i++)
    {
      GError *error = NULL;
      HlAddress found;
      if (hl_address_parse (rows[i].text, plant, &found, &error))
        g_error ("“%s” was taken", rows[i].text);
      g_assert_true (g_error_matches (error, HL_PLANT_ERROR, HL_PLANT_ERROR_ADDRESS));
      assert_message (&error, rows[i].says);
    }
}

static void
test_equal_compares_all_parts (void)
{
  HlAddress a = hl_address_component ("T1", "power"), b = hl_address_component ("T1", "power");
  HlAddress c = hl_address_stream ("T1", "power"), d = hl_address_component ("T2", "power"), e = hl_address_plant ("power");
  g_assert_true (hl_address_equal (&a, &b));
  g_assert_false (hl_address_equal (&a, &c));
  g_assert_false (hl_address_equal (&a, &d));
  g_assert_false (hl_address_equal (&a, &e));
}

int
main (int argc, char **argv)
{
  g_test_init (&argc, &argv, NULL);
  g_test_add_func ("/address/grammar", test_grammar);
  g_test_add_func ("/address/bad-addresses", test_bad_addresses);
  g_test_add_func ("/address/equal-compares-all-parts", test_equal_compares_all_parts);
  return g_test_run ();
}
