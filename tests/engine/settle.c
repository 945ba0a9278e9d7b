/* Settling: which assumed value yields, what comes back, and what stays as typed.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "plants.h"
#include <math.h>

#define NEW_LOOP "new heat_input Q1\nnew turbine T1\nnew generator G1\nnew condenser C1\nnew pump P1\n" \
  "Q1.steam > T1.inlet\nT1.exhaust > C1.steam\nC1.condensate > P1.inlet\nP1.outlet > Q1.feed\nshaft T1 G1\nplant net_power=10e6\n"

static HlAddress
address_of (HlPlant *plant, const char *text)
{
  HlAddress address;
  g_autoptr (GError) error = NULL;
  g_assert_true (hl_address_parse (text, plant, &address, &error));
  return address;
}

/* Sets a value and settles; the yields must read like this, one a line.  Takes @plant. */
static HlPlant *
edit (HlPlant *plant, const char *text, double value, const char *yields)
{
  HlAddress address = address_of (plant, text);
  HlPlant *typed = isnan (value) ? test_plant_let_go (plant, text) : test_plant_set (plant, text, value);
  GArray *yielded;
  HlPlant *settled = hl_settle (typed, &address, &yielded);
  g_autoptr (GString) said = g_string_new (NULL);
  for (guint k = 0; k < yielded->len; k++)
    g_string_append_printf (said, "%s%s", k > 0 ? "\n" : "", g_array_index (yielded, HlYield, k).text);
  g_assert_cmpstr (said->str, ==, yields);
  g_array_unref (yielded);
  hl_plant_unref (typed);
  return settled;
}

static HlSolution *
solved (HlPlant *plant)
{
  HlSolution *s = hl_solve (plant, NULL);
  test_assert_solved (s);
  return s;
}

/* A fresh loop of defaults is solvable as it stands. */
static void
test_defaults_solve (void)
{
  g_autoptr (HlPlant) plant = test_plant (NEW_LOOP);
  g_autoptr (HlSolution) s = solved (plant);
  test_assert_near (test_value (s, "C1.steam.p"), 4008.0, 1e-3);
}

/* Exhaust pressure typed at the turbine: what yields is the condenser's terminal difference. */
static void
test_another_component_yields (void)
{
  g_autoptr (HlPlant) plant = edit (test_plant (NEW_LOOP), "T1.exhaust.p", 7000.0, "terminal temperature difference of C1 is now found");
  g_autoptr (HlSolution) s = solved (plant);
  test_assert_near (test_value (s, "T1.exhaust.p"), 7000.0, 1e-12);
  g_assert_cmpfloat (test_value (s, "C1.terminal_difference"), >, 4.0);
}

/* The same component comes first, whatever the ranks elsewhere. */
static void
test_same_component_yields_first (void)
{
  HlPlant *plant = edit (test_plant (NEW_LOOP), "C1.UA", 1.2e6, "terminal temperature difference of C1 is now found");
  g_autoptr (HlPlant) next = edit (plant, "C1.steam.p", 5600.0, "cooling water rise of C1 is now found");
  g_autoptr (HlSolution) s = solved (next);
  test_assert_near (test_value (s, "T1.exhaust.p"), 5600.0, 1e-12);
  test_assert_near (test_value (s, "C1.UA"), 1.2e6, 1e-9);
  g_autoptr (HlPlant) turbine = edit (test_plant (NEW_LOOP), "T1.exhaust.x", 0.9, "inlet pressure of T1 is now found");
  g_autoptr (HlSolution) t = solved (turbine);
  test_assert_near (test_value (t, "T1.exhaust.x"), 0.9, 1e-9);
}

/* A flow typed: the assumed net power gives way; a net power typed is not assumed, and then the surplus stays for a finding. */
static void
test_typed_values_never_yield (void)
{
  g_autoptr (HlPlant) plant = edit (test_plant (test_simple_loop), "T1.inlet.m", 10.0, "");
  g_autoptr (HlSolution) s = hl_solve (plant, NULL);
  g_assert_nonnull (test_finding (s, "surplus-value"));
  HlAddress net = address_of (plant, "plant.net_power");
  test_assert_near (hl_plant_value (plant, &net)->value, 12e6, 1e-15);
}

static void
test_assumed_net_power_yields (void)
{
  HlPlant *plant = test_plant (NEW_LOOP);
  HlAddress net = address_of (plant, "plant.net_power");
  HlValue assumed = { .origin = HL_ORIGIN_ASSUMED, .value = 10e6 };
  HlPlant *open = hl_plant_with_value (plant, &net, &assumed, NULL);
  hl_plant_unref (plant);
  g_autoptr (HlPlant) settled = edit (open, "plant.gross_power", 15e6, "net power of the plant is now found");
  g_autoptr (HlSolution) s = solved (settled);
  test_assert_near (test_value (s, "G1.power"), 15e6, 1e-10);
}

/* A typed flow, power or heat sizes the plant: net power yields before anything else. */
static void
test_size_replaces_net_power (void)
{
  static const struct { const char *address; double value; } sizes[] = {
    { "T1.inlet.m", 9.0 }, { "C1.heat", 20e6 }, { "Q1.heat", 30e6 }, { "T1.power", 9e6 }, { "C1.cooling_flow", 500.0 } };
  for (guint k = 0; k < G_N_ELEMENTS (sizes); k++)
    {
      HlPlant *plant = test_plant (NEW_LOOP);
      HlAddress net = address_of (plant, "plant.net_power");
      HlValue assumed = { .origin = HL_ORIGIN_ASSUMED, .value = 10e6 };
      HlPlant *open = hl_plant_with_value (plant, &net, &assumed, NULL);
      hl_plant_unref (plant);
      g_autoptr (HlPlant) settled = edit (open, sizes[k].address, sizes[k].value, "net power of the plant is now found");
      g_autoptr (HlSolution) s = solved (settled);
      test_assert_near (test_value (s, sizes[k].address), sizes[k].value, 1e-9);
    }
}

/* An efficiency of the whole is not met by a plant at rest: what yields is something that it depends on. */
static void
test_efficiency_finds_something_else (void)
{
  HlPlant *plant = test_plant (NEW_LOOP);
  GArray *yielded;
  HlAddress address = address_of (plant, "plant.cycle_efficiency");
  HlPlant *typed = test_plant_set (plant, "plant.cycle_efficiency", 0.35);
  g_autoptr (HlPlant) settled = hl_settle (typed, &address, &yielded);
  hl_plant_unref (typed);
  g_assert_cmpuint (yielded->len, ==, 1);
  g_array_unref (yielded);
  g_autoptr (HlSolution) s = solved (settled);
  test_assert_near (test_value (s, "plant.cycle_efficiency"), 0.35, 1e-9);
  test_assert_near (test_value (s, "plant.net_power"), 10e6, 1e-9);
}

/* Let go again, the usual quantity of the component comes back with its default. */
static void
test_what_is_let_go_comes_back (void)
{
  HlPlant *plant = edit (test_plant (NEW_LOOP), "C1.UA", 1.2e6, "terminal temperature difference of C1 is now found");
  plant = edit (plant, "C1.UA", NAN, "terminal temperature difference of C1 is assumed again");
  HlAddress difference = address_of (plant, "C1.terminal_difference");
  const HlValue *value = hl_plant_value (plant, &difference);
  g_assert_nonnull (value);
  g_assert_cmpint (value->origin, ==, HL_ORIGIN_ASSUMED);
  test_assert_near (value->value, 4.0, 1e-15);
  plant = edit (plant, "Q1.steam.T", NAN, "steam temperature of Q1 is assumed again");
  g_autoptr (HlPlant) last = plant;
  g_autoptr (HlSolution) s = solved (last);
}

/* What yielded elsewhere comes back when that which it yielded to goes: a pressure, a flow, a power. */
static void
test_what_yielded_elsewhere_comes_back (void)
{
  HlPlant *plant = edit (test_plant (NEW_LOOP), "T1.exhaust.p", 7000.0, "terminal temperature difference of C1 is now found");
  g_autoptr (HlPlant) again = edit (plant, "T1.exhaust.p", NAN, "terminal temperature difference of C1 is assumed again");
  g_autoptr (HlSolution) s = solved (again);
  test_assert_near (test_value (s, "C1.steam.p"), 4008.0, 1e-3);

  HlPlant *sized = test_plant (NEW_LOOP);
  HlAddress net = address_of (sized, "plant.net_power");
  HlValue assumed = { .origin = HL_ORIGIN_ASSUMED, .value = 10e6 };
  HlPlant *open = hl_plant_with_value (sized, &net, &assumed, NULL);
  hl_plant_unref (sized);
  open = edit (open, "T1.inlet.m", 9.0, "net power of the plant is now found");
  open = edit (open, "T1.inlet.m", NAN, "net power of the plant is assumed again");
  open = edit (open, "plant.gross_power", 15e6, "net power of the plant is now found");
  g_autoptr (HlPlant) last = edit (open, "plant.gross_power", NAN, "net power of the plant is assumed again");
  g_autoptr (HlSolution) t = solved (last);
}

/* Where nothing is missing nothing comes back, and where nothing is too much nothing yields. */
static void
test_nothing_to_settle (void)
{
  g_autoptr (HlPlant) plant = test_plant (test_reheat_plant);
  GArray *yielded;
  g_autoptr (HlPlant) settled = hl_settle (plant, NULL, &yielded);
  g_assert_true (settled == plant);
  g_assert_cmpuint (yielded->len, ==, 0);
  g_array_unref (yielded);
  g_autoptr (HlPlant) changed = edit (test_plant (test_reheat_plant), "H1.terminal_difference", 4.0, "");
}

/* Lines that make two assumed pressures meet: a change of topology, with no value edited. */
static void
test_topology_settles (void)
{
  HlPlant *plant = test_plant (NEW_LOOP "new steam_user U1\nnew boundary Y1 direction:0\nnew boundary Y2 direction:1\nnew steam_user U2\n"
                               "boundary Y3 direction:0 outlet.p=6e5 outlet.T=450\nboundary Y4 direction:1 inlet.p=2e5\nY3.outlet > U1.steam\nU1.condensate > Y4.inlet\n");
  GArray *yielded;
  g_autoptr (HlPlant) settled = hl_settle (plant, NULL, &yielded);
  hl_plant_unref (plant);
  gboolean found = FALSE;
  for (guint k = 0; k < yielded->len; k++)
    found |= g_str_equal (g_array_index (yielded, HlYield, k).text, "condensate pressure of U1 is now found");
  g_assert_true (found);
  g_array_unref (yielded);
}

/* Surplus in a part of the drawing settles even while other ports are open. */
static void
test_settles_while_drawing (void)
{
  HlPlant *plant = test_plant ("new turbine T1\nnew condenser C1\nT1.exhaust > C1.steam\n");
  g_autoptr (HlPlant) settled = edit (plant, "C1.steam.p", 5000.0, "terminal temperature difference of C1 is now found");
  g_autoptr (HlSolution) s = hl_solve (settled, NULL);
  g_assert_nonnull (test_finding (s, "open-port"));
  g_assert_null (test_finding (s, "surplus-value"));
}

/* Two heaters: what yields is near the edit, and the numbers agree. */
static void
test_nearest_yields (void)
{
  HlPlant *plant = test_plant (test_large_plant);
  for (guint c = 0; c < hl_plant_n_components (plant); c++)
    {
      HlComponent *component = hl_component_copy (hl_plant_component (plant, c));
      for (guint k = 0; k < component->values.n; k++)
        component->values.entries[k].value.origin = HL_ORIGIN_ASSUMED;
      HlPlant *next = hl_plant_with_component (plant, component);
      hl_plant_unref (plant);
      plant = next;
    }
  g_autoptr (HlPlant) settled = edit (plant, "H3.feed_outlet.T", 388.0, "terminal temperature difference of H3 is now found");
  g_autoptr (HlSolution) s = solved (settled);
  test_assert_near (test_value (s, "H3.feed_outlet.T"), 388.0, 1e-10);
}

/* A generator and a turbine put down, not connected yet: the power that a new plant assumes does not yield to that. */
static void
test_nothing_yields_to_what_is_being_drawn (void)
{
  static const char *const beginnings[] = { "new generator G1\n", "new turbine T1\nnew generator G1\n", "new turbine T1\nnew generator G1\nshaft T1 G1\nnew pump P1\n" };
  for (guint k = 0; k < G_N_ELEMENTS (beginnings); k++)
    {
      GArray *yielded;
      g_autofree char *text = g_strconcat (beginnings[k], "plant net_power=10e6\n", NULL);
      HlPlant *plant = test_plant (text);
      HlAddress net = hl_address_plant (g_intern_static_string ("net_power"));
      HlValue assumed = { .origin = HL_ORIGIN_ASSUMED, .value = 10e6 };
      g_autoptr (HlPlant) drawn = hl_plant_with_value (plant, &net, &assumed, NULL);
      g_autoptr (HlPlant) settled = hl_settle (drawn, NULL, &yielded);
      g_assert_cmpuint (yielded->len, ==, k == 0);      /* a generator alone gives nothing at all */
      g_array_unref (yielded);
      hl_plant_unref (plant);
    }
}

int
main (int argc, char **argv)
{
  g_test_init (&argc, &argv, NULL);
  g_test_add_func ("/engine/settle/defaults-solve", test_defaults_solve);
  g_test_add_func ("/engine/settle/another-component-yields", test_another_component_yields);
  g_test_add_func ("/engine/settle/same-component-yields-first", test_same_component_yields_first);
  g_test_add_func ("/engine/settle/typed-values-never-yield", test_typed_values_never_yield);
  g_test_add_func ("/engine/settle/assumed-net-power-yields", test_assumed_net_power_yields);
  g_test_add_func ("/engine/settle/size-replaces-net-power", test_size_replaces_net_power);
  g_test_add_func ("/engine/settle/efficiency-finds-something-else", test_efficiency_finds_something_else);
  g_test_add_func ("/engine/settle/what-is-let-go-comes-back", test_what_is_let_go_comes_back);
  g_test_add_func ("/engine/settle/what-yielded-elsewhere-comes-back", test_what_yielded_elsewhere_comes_back);
  g_test_add_func ("/engine/settle/nothing-to-settle", test_nothing_to_settle);
  g_test_add_func ("/engine/settle/topology-settles", test_topology_settles);
  g_test_add_func ("/engine/settle/settles-while-drawing", test_settles_while_drawing);
  g_test_add_func ("/engine/settle/nearest-yields", test_nearest_yields);
  g_test_add_func ("/engine/settle/being-drawn", test_nothing_yields_to_what_is_being_drawn);
  return g_test_run ();
}
