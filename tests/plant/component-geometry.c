/* Geometry: ports under turn and mirror, widths that grow.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "plant-test.h"

static void
assert_place (HlComponent *component, const char *port, int x, int y, HlSide side)
{
  guint n;
  int at_x, at_y;
  HlSide at_side;
  g_assert_true (hl_component_find_port (component, port, &n));
  hl_component_port_place (component, n, &at_x, &at_y, &at_side);
  if (at_x != x || at_y != y || at_side != side)
    g_error ("%s of %s lies at %d, %d side %d, not at %d, %d side %d", port, component->kind->id, at_x, at_y, at_side, x, y, side);
}

/* Places by the specification of the kinds, as a clock face would show them. */
static void
test_turn_and_mirror (void)
{
  g_autoptr (HlComponent) pump = hl_component_new (hl_kind_lookup ("pump"), "P1", 10, 20);
  assert_place (pump, "inlet", 8, 20, HL_SIDE_LEFT);
  assert_place (pump, "outlet", 12, 20, HL_SIDE_RIGHT);
  pump->turn = 1;   /* clockwise: what pointed right points down */
  assert_place (pump, "outlet", 10, 22, HL_SIDE_DOWN);
  assert_place (pump, "inlet", 10, 18, HL_SIDE_UP);
  pump->turn = 2;
  assert_place (pump, "outlet", 8, 20, HL_SIDE_LEFT);
  pump->turn = 3;
  assert_place (pump, "outlet", 10, 18, HL_SIDE_UP);
  pump->turn = 0;
  pump->is_mirrored = TRUE;
  assert_place (pump, "outlet", 8, 20, HL_SIDE_LEFT);
  pump->turn = 1;   /* mirrored first, then turned */
  assert_place (pump, "outlet", 10, 18, HL_SIDE_UP);
}

static void
test_mirror_keeps_up_and_down (void)
{
  g_autoptr (HlComponent) heater = hl_component_new (hl_kind_lookup ("closed_heater"), "H1", 0, 0);
  heater->is_mirrored = TRUE;
  assert_place (heater, "steam", 0, -2, HL_SIDE_UP);
  assert_place (heater, "drain", 0, 2, HL_SIDE_DOWN);
  assert_place (heater, "feed_inlet", -2, 0, HL_SIDE_LEFT);
  assert_place (heater, "drain_inlet", 2, -1, HL_SIDE_RIGHT);
}

static void
test_turbine_widens_with_its_extractions (void)
{
  static const int widths[] = { 2, 2, 3, 4, 5, 6, 7, 8, 9 };
  for (int n = 0; n <= 8; n++)
    {
      g_autoptr (HlComponent) turbine = hl_component_new (hl_kind_lookup ("turbine"), "T1", 0, 0);
      int width, height, left_x, right_x, y;
      hl_component_set_option (turbine, "extractions", n);
      hl_component_half_size (turbine, &width, &height);
      g_assert_cmpint (width, ==, widths[n]);
      g_assert_cmpint (height, ==, 3);
      assert_place (turbine, "inlet", -width, -1, HL_SIDE_UP);
      assert_place (turbine, "exhaust", width, 3, HL_SIDE_DOWN);
      for (int i = 1; i <= n; i++)
        {
          g_autofree char *key = g_strdup_printf ("extraction%d", i);
          assert_place (turbine, key, -width + 2 * i, 3, HL_SIDE_DOWN);
        }
      hl_component_shaft_place (turbine, 0, &left_x, &y);
      hl_component_shaft_place (turbine, 1, &right_x, &y);
      g_assert_cmpint (left_x, ==, -width);
      g_assert_cmpint (right_x, ==, width);
      g_assert_cmpint (y, ==, 0);
      turbine->turn = 1;
      hl_component_half_size (turbine, &width, &height);
      g_assert_cmpint (width, ==, 3);
      g_assert_cmpint (height, ==, widths[n]);
      hl_component_shaft_place (turbine, 1, &right_x, &y);
      g_assert_cmpint (right_x, ==, 0);
      g_assert_cmpint (y, ==, widths[n]);
    }
}

static void
test_numbered_places (void)
{
  g_autoptr (HlComponent) heater = hl_component_new (hl_kind_lookup ("open_heater"), "D1", 0, 0);
  g_autoptr (HlComponent) boiler = hl_component_new (hl_kind_lookup ("boiler"), "B1", 0, 0);
  g_autoptr (HlComponent) splitter = hl_component_new (hl_kind_lookup ("splitter"), "X1", 0, 0);
  hl_component_set_option (heater, "inlets", 6);
  hl_component_set_option (boiler, "reheats", 2);
  hl_component_set_option (splitter, "outlets", 3);
  assert_place (heater, "inlet1", 3, 0, HL_SIDE_RIGHT);
  assert_place (heater, "inlet2", -3, 0, HL_SIDE_LEFT);
  assert_place (heater, "inlet6", -3, -1, HL_SIDE_LEFT);
  assert_place (boiler, "cold_reheat1", 3, 1, HL_SIDE_RIGHT);
  assert_place (boiler, "cold_reheat2", -3, 1, HL_SIDE_LEFT);
  assert_place (boiler, "hot_reheat2", -3, -1, HL_SIDE_LEFT);
  assert_place (splitter, "outlet1", 1, 0, HL_SIDE_RIGHT);
  assert_place (splitter, "outlet2", 0, 1, HL_SIDE_DOWN);
  assert_place (splitter, "outlet3", 0, -1, HL_SIDE_UP);
}

/* Law: however turned and mirrored, ports lie on or in the box, no two at one place, and a line leaves outwards. */
static void
test_ports_lie_on_the_box (void)
{
  for (guint k = 0; k < hl_kind_count (); k++)
    for (int pose = 0; pose < 8; pose++)
      {
        g_autoptr (HlComponent) component = hl_component_new (hl_kind_nth (k), "A1", 7, -5);
        int width, height;
        for (guint i = 0; i < component->kind->n_options; i++)
          if (component->kind->options[i].choices == NULL)
            hl_component_set_option (component, component->kind->options[i].key, component->kind->options[i].most);
        component->turn = pose % 4;
        component->is_mirrored = pose >= 4;
        hl_component_half_size (component, &width, &height);
        for (guint i = 0; i < hl_component_n_ports (component); i++)
          {
            int x, y;
            HlSide side;
            hl_component_port_place (component, i, &x, &y, &side);
            x -= 7;
            y += 5;
            g_assert_cmpint (ABS (x), <=, width);
            g_assert_cmpint (ABS (y), <=, height);
            g_assert_cmpint (side == HL_SIDE_RIGHT ? x : side == HL_SIDE_LEFT ? -x : side == HL_SIDE_DOWN ? y : -y, >, 0);
            for (guint j = 0; j < i; j++)
              {
                int other_x, other_y;
                hl_component_port_place (component, j, &other_x, &other_y, NULL);
                g_assert_false (other_x == x + 7 && other_y == y - 5);
              }
          }
      }
}

int
main (int argc, char **argv)
{
  g_test_init (&argc, &argv, NULL);
  g_test_add_func ("/geometry/turn-and-mirror", test_turn_and_mirror);
  g_test_add_func ("/geometry/mirror-keeps-up-and-down", test_mirror_keeps_up_and_down);
  g_test_add_func ("/geometry/turbine-widens-with-its-extractions", test_turbine_widens_with_its_extractions);
  g_test_add_func ("/geometry/numbered-places", test_numbered_places);
  g_test_add_func ("/geometry/ports-lie-on-the-box", test_ports_lie_on_the_box);
  return g_test_run ();
}
