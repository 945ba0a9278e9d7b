/* Any quantity given, any other found: one value let go, another given, and back again.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "laws.h"
#include <math.h>
#include <string.h>

#define TALLOW "tallow-fen.heatloom"
#define VESPER "vesper-point.heatloom"
#define MARROW "marrow-quay.heatloom"

/* @factor: how far from its value the newly given quantity moves. */
static const struct { const char *plant, *given, *found; double factor; } pairs[] = {
  /* The duty given, the fuel found. */
  { MARROW, "plant.net_power", "B1.main_heat", 1.05 },
  { MARROW, "plant.fuel_flow", "B1.main_heat", 0.95 },
  { MARROW, "plant.gross_power", "DH1.heat", 1.1 },
  { MARROW, "plant.utilisation", "DH1.heat", 1.05 },
  { MARROW, "AC1.heat", "DH1.heat", 0.8 },
  { MARROW, "DH1.water_flow", "DH1.heat", 0.7 },
  { MARROW, "DH1.steam.m", "DH1.heat", 1.1 },
  { TALLOW, "plant.net_power", "B1.steam.m", 0.8 },
  { TALLOW, "plant.fuel_flow", "B1.steam.m", 1.1 },
  { TALLOW, "U1.heat", "U1.steam.m", 0.5 },
  { TALLOW, "plant.gross_power", "U1.steam.m", 1.1 },
  { VESPER, "B1.fuel_flow", "plant.gross_power", 0.9 },
  { VESPER, "T1.inlet.m", "plant.gross_power", 1.02 },
  { VESPER, "C1.heat", "plant.gross_power", 0.95 },
  { VESPER, "plant.net_power", "plant.gross_power", 1.01 },
  /* Sizes and differences. */
  { TALLOW, "H1.UA", "H1.terminal_difference", 1.2 },
  { TALLOW, "H1.drain.T", "H1.drain_approach", 1.01 },
  { TALLOW, "B1.feed.T", "T1.extraction1.p", 0.99 },
  { VESPER, "C1.UA", "C1.terminal_difference", 1.1 },
  { VESPER, "C1.steam.p", "C1.terminal_difference", 1.1 },
  { VESPER, "C1.cooling_flow", "C1.cooling_rise", 1.2 },
  { VESPER, "H4.UA", "H4.terminal_difference", 0.9 },
  { VESPER, "H7.UA", "H7.terminal_difference", 0.9 },
  { VESPER, "H6.drain_subcooling", "H6.drain_approach", 1.05 },
  { VESPER, "B1.feed.T", "H7.terminal_difference", 0.995 },
  { VESPER, "B1.feed.T", "T1.exhaust.p", 0.995 },
  { MARROW, "DH1.UA", "DH1.flow_T", 0.98 },
  { MARROW, "AC1.initial_difference", "AC1.steam.p", 1.1 },
  /* Moisture, and the pressure that makes it. */
  { VESPER, "T3.exhaust_moisture", "B1.hot_reheat1.p", 0.97 },
  { VESPER, "T3.exhaust_moisture", "B1.hot_reheat1.T", 0.97 },
  { TALLOW, "T1.exhaust_moisture", "T1.exhaust.p", 0.9 },
  { TALLOW, "T1.exhaust_moisture", "B1.steam.T", 0.95 },
  /* Machines. */
  { TALLOW, "T1.power", "T1.isentropic_efficiency", 0.98 },
  { TALLOW, "plant.gross_power", "G1.efficiency", 0.99 },
  { TALLOW, "P2.motor_power", "P2.isentropic_efficiency", 1.1 },
  { TALLOW, "plant.fuel_heat", "B1.efficiency", 1.02 },
  { VESPER, "T2.power", "T2.isentropic_efficiency", 0.99 },
  { VESPER, "FT1.inlet.m", "FT1.isentropic_efficiency", 1.05 },
  { VESPER, "FT1.power", "P2.isentropic_efficiency", 1.03 },
  { VESPER, "P2.power", "P2.outlet.p", 1.05 },
  { VESPER, "plant.heat_rate", "T3.isentropic_efficiency", 1.003 },
  { VESPER, "plant.gross_efficiency", "B1.efficiency", 1.01 },
  { VESPER, "T1.flow_constant1", "V1.pressure_loss", 1.01 },
  { VESPER, "T3.flow_constant2", "T3.extraction1.p", 1.05 },
  /* Pressures and flows along lines. */
  { VESPER, "H4.steam.p", "L4.pressure_loss", 0.99 },
  { VESPER, "H4.feed_outlet.T", "T3.extraction1.p", 0.99 },
  { VESPER, "D1.outlet.T", "L5.pressure_loss", 0.999 },
  { VESPER, "L9.pressure_loss", "FT1.exhaust.p", 1.1 },
  { VESPER, "T1.inlet.p", "V1.pressure_loss", 0.99 },
  { VESPER, "T2.inlet.p", "V2.pressure_loss", 0.99 },
  { TALLOW, "W1.outlet.m", "U1.return_fraction", 1.3 },
  { TALLOW, "D1.outlet.T", "D1.steam.p", 0.99 },
};

static HlPlant *
load (const char *name)
{
  g_autofree char *path = g_test_build_filename (G_TEST_DIST, "..", "data", "examples", name, NULL);
  g_autoptr (GError) error = NULL;
  HlPlant *plant = hl_plant_load (path, &error);
  g_assert_no_error (error);
  return plant;
}

/* One address let go, wherever its value stands; the other given.  Takes @plant. */
static HlPlant *
swap (HlPlant *plant, const char *let_go, const char *given, double value)
{
  HlAddress address, where;
  g_autoptr (GError) error = NULL;
  g_assert_true (hl_address_parse (let_go, plant, &address, &error));
  if (hl_plant_value_wherever (plant, &address, &where) == NULL)
    g_error ("%s has no value to let go", let_go);
  g_autofree char *text = hl_address_to_text (&where);
  return test_plant_set (test_plant_let_go (plant, text), given, value);
}

static HlSolution *
solve (HlPlant *plant, const HlSolution *start, const char *given, const char *found)
{
  HlSolution *s = hl_solve (plant, start);
  if (!hl_solution_is_solved (s))
    {
      test_print (s);
      g_error ("%s given, %s not found", given, found);
    }
  test_assert_balanced (s);
  return s;
}

static void
check_pair (guint k)
{
  const char *given = pairs[k].given, *found = pairs[k].found;
  HlPlant *plant = load (pairs[k].plant);
  g_autoptr (HlSolution) before = hl_solve (plant, NULL);
  test_assert_solved (before);
  double was = test_value (before, found), wanted = test_value (before, given) * pairs[k].factor;
  if (!isfinite (was) || !isfinite (wanted))
    g_error ("%s: %s or %s has no value", pairs[k].plant, given, found);
  plant = swap (plant, found, given, wanted);
  /* From where the plant stood, as an edit does. */
  g_autoptr (HlSolution) there = solve (plant, before, given, found);
  double is = test_value (there, found);
  test_assert_near (test_value (there, given), wanted, 1e-9);
  if (!(fabs (is - was) > 1e-6 * fabs (was)))
    g_error ("%s does not move when %s goes from %g to %g", found, given, wanted / pairs[k].factor, wanted);
  /* And back: what was found, given, finds what was given. */
  plant = swap (plant, given, found, is);
  g_autoptr (HlSolution) back = solve (plant, there, found, given);
  hl_plant_unref (plant);
  if (!(fabs (test_value (back, given) - wanted) <= 1e-6 * fabs (wanted)))
    g_error ("%s given as %.12g finds %s as %.12g, not the %.12g that had found it", found, is, given, test_value (back, given), wanted);
}

static void
test_pair (gconstpointer data)
{
  check_pair (GPOINTER_TO_UINT (data));
}

/* All but one value assumed; the edit makes one of them give way, which the program names. */
static const struct { const char *plant, *given, *yields; double factor; } edits[] = {
  { VESPER, "H3.UA", "terminal temperature difference of H3 is now found", 1.1 },
  { VESPER, "C1.UA", "terminal temperature difference of C1 is now found", 1.1 },
  { VESPER, "H4.feed_outlet.T", "terminal temperature difference of H4 is now found", 0.998 },
  { VESPER, "B1.feed.T", "terminal temperature difference of H7 is now found", 0.998 },
  { VESPER, "B1.fuel_flow", "gross power of the plant is now found", 1.1 },
  { TALLOW, "H1.UA", "terminal temperature difference of H1 is now found", 1.1 },
};

static HlPlant *
all_assumed (const char *name)
{
  HlPlant *plant = load (name);
  for (guint c = 0; c < hl_plant_n_components (plant); c++)
    {
      HlComponent *component = hl_component_copy (hl_plant_component (plant, c));
      for (guint k = 0; k < component->values.n; k++)
        if (component->values.entries[k].value.origin == HL_ORIGIN_GIVEN)
          component->values.entries[k].value.origin = HL_ORIGIN_ASSUMED;
      HlPlant *next = hl_plant_with_component (plant, component);
      hl_plant_unref (plant);
      plant = next;
    }
  HlAddress gross = hl_address_plant (g_intern_static_string ("gross_power"));
  const HlValue *power = hl_plant_value (plant, &gross);
  if (power == NULL)
    return plant;
  HlValue assumed = { .origin = HL_ORIGIN_ASSUMED, .value = power->value };
  HlPlant *next = hl_plant_with_value (plant, &gross, &assumed, NULL);
  hl_plant_unref (plant);
  return next;
}

static void
test_yields (void)
{
  for (guint k = 0; k < G_N_ELEMENTS (edits); k++)
    {
      HlAddress address;
      g_autoptr (GError) error = NULL;
      HlPlant *plant = all_assumed (edits[k].plant);
      g_autoptr (HlSolution) before = hl_solve (plant, NULL);
      test_assert_solved (before);
      double wanted = test_value (before, edits[k].given) * edits[k].factor;
      g_assert_true (hl_address_parse (edits[k].given, plant, &address, &error));
      plant = test_plant_set (plant, edits[k].given, wanted);
      GArray *yielded;
      g_autoptr (HlPlant) settled = hl_settle (plant, &address, &yielded);
      hl_plant_unref (plant);
      g_assert_cmpuint (yielded->len, ==, 1);
      g_assert_cmpstr (g_array_index (yielded, HlYield, 0).text, ==, edits[k].yields);
      g_array_unref (yielded);
      g_autoptr (HlSolution) s = solve (settled, before, edits[k].given, edits[k].yields);
      test_assert_near (test_value (s, edits[k].given), wanted, 1e-9);
    }
}

int
main (int argc, char **argv)
{
  g_test_init (&argc, &argv, NULL);
  for (guint k = 0; k < G_N_ELEMENTS (pairs); k++)
    {
      g_autofree char *name = g_strdup_printf ("/engine/pairs/%.*s/%s-finds-%s", (int) strcspn (pairs[k].plant, "."), pairs[k].plant, pairs[k].given, pairs[k].found);
      g_test_add_data_func (name, GUINT_TO_POINTER (k), test_pair);
    }
  g_test_add_func ("/engine/pairs/yields", test_yields);
  return g_test_run ();
}
