/* Ways on an empty field, round boxes, beside other lines and through hand-set bends.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "draw/router.h"

static const HlGridPoint *
point (const GArray *way, guint n)
{
  return &g_array_index (way, HlGridPoint, n);
}

static GArray *
find (HlRouter *router, HlRouteEnd from, HlRouteEnd to)
{
  GArray *way = g_array_new (FALSE, FALSE, sizeof (HlGridPoint));
  g_assert_true (hl_router_find (router, &from, &to, NULL, 0, way));
  return way;
}

static void
test_facing_ports_are_joined_straight (void)
{
  g_autoptr (HlRouter) router = hl_router_new (-10, -10, 30, 30);
  g_autoptr (GArray) way = find (router, (HlRouteEnd) { 0, 0, HL_SIDE_RIGHT }, (HlRouteEnd) { 12, 0, HL_SIDE_LEFT });
  g_assert_cmpuint (way->len, ==, 2);
  g_assert_cmpint (point (way, 1)->x, ==, 12);
}

static void
test_corner_needs_one_bend (void)
{
  g_autoptr (HlRouter) router = hl_router_new (-10, -10, 30, 30);
  g_autoptr (GArray) way = find (router, (HlRouteEnd) { 0, 0, HL_SIDE_RIGHT }, (HlRouteEnd) { 12, 9, HL_SIDE_UP });
  g_assert_cmpuint (way->len, ==, 3);
  g_assert_cmpint (point (way, 1)->x, ==, 12);
  g_assert_cmpint (point (way, 1)->y, ==, 0);
}

/* Away from the goal first: out, along, and back in, four bends and no fewer. */
static void
test_port_that_looks_away_is_led_round (void)
{
  g_autoptr (HlRouter) router = hl_router_new (-20, -20, 40, 30);
  g_autoptr (GArray) way = find (router, (HlRouteEnd) { 0, 0, HL_SIDE_LEFT }, (HlRouteEnd) { 12, 0, HL_SIDE_LEFT });
  g_assert_cmpuint (way->len, >=, 5);
  g_assert_cmpint (point (way, 1)->x, <, 0);
  g_assert_cmpint (point (way, way->len - 2)->x, <, 12);
}

static void
test_goes_round_a_box (void)
{
  g_autoptr (HlRouter) router = hl_router_new (-20, -20, 40, 30);
  g_autoptr (GArray) way = NULL;
  hl_router_add_box (router, 4, -3, 8, 3);
  way = find (router, (HlRouteEnd) { 0, 0, HL_SIDE_RIGHT }, (HlRouteEnd) { 12, 0, HL_SIDE_LEFT });
  for (guint i = 0; i + 1 < way->len; i++)
    {
      int left = MIN (point (way, i)->x, point (way, i + 1)->x), right = MAX (point (way, i)->x, point (way, i + 1)->x);
      int top = MIN (point (way, i)->y, point (way, i + 1)->y), bottom = MAX (point (way, i)->y, point (way, i + 1)->y);
      g_assert_false (right >= 4 && left <= 8 && bottom >= -3 && top <= 3);
    }
}

static void
test_second_line_keeps_off_the_first (void)
{
  g_autoptr (HlRouter) router = hl_router_new (-20, -20, 40, 30);
  g_autoptr (GArray) first = find (router, (HlRouteEnd) { 0, 0, HL_SIDE_RIGHT }, (HlRouteEnd) { 20, 10, HL_SIDE_LEFT });
  g_autoptr (GArray) second = NULL;
  hl_router_add_line (router, point (first, 0), first->len);
  second = find (router, (HlRouteEnd) { 0, 2, HL_SIDE_RIGHT }, (HlRouteEnd) { 20, 12, HL_SIDE_LEFT });
  g_assert_cmpuint (first->len, ==, 4);
  g_assert_cmpuint (second->len, ==, 4);
  g_assert_cmpint (ABS (point (first, 1)->x - point (second, 1)->x), >=, 2);
}

static void
test_step_settles_in_the_middle (void)
{
  g_autoptr (HlRouter) router = hl_router_new (-20, -20, 40, 30);
  g_autoptr (GArray) way = find (router, (HlRouteEnd) { 0, 0, HL_SIDE_RIGHT }, (HlRouteEnd) { 20, 10, HL_SIDE_LEFT });
  hl_router_settle (router, way);
  g_assert_cmpuint (way->len, ==, 4);
  g_assert_cmpint (point (way, 1)->x, ==, 10);
  g_assert_cmpint (point (way, 2)->x, ==, 10);
}

static void
test_hand_set_bends_are_passed (void)
{
  static const HlGridPoint via[] = { { 6, -8 }, { 14, -8 } };
  g_autoptr (HlRouter) router = hl_router_new (-20, -20, 40, 30);
  g_autoptr (GArray) way = g_array_new (FALSE, FALSE, sizeof (HlGridPoint));
  HlRouteEnd from = { 0, 0, HL_SIDE_RIGHT }, to = { 20, 0, HL_SIDE_LEFT };
  int n_met = 0;
  g_assert_true (hl_router_find (router, &from, &to, via, 2, way));
  for (guint i = 0; i < way->len; i++)
    n_met += point (way, i)->y == -8 && (point (way, i)->x == 6 || point (way, i)->x == 14);
  g_assert_cmpint (n_met, ==, 2);
}

/* A port walled in has no way: the line is drawn all the same. */
static void
test_walled_in_port_gets_a_plain_way (void)
{
  g_autoptr (HlRouter) router = hl_router_new (-20, -20, 40, 30);
  g_autoptr (GArray) way = g_array_new (FALSE, FALSE, sizeof (HlGridPoint));
  HlRouteEnd from = { 0, 0, HL_SIDE_RIGHT }, to = { 20, 5, HL_SIDE_LEFT };
  hl_router_add_box (router, -4, -4, 4, -2);
  hl_router_add_box (router, -4, 2, 4, 4);
  hl_router_add_box (router, -4, -4, -2, 4);
  hl_router_add_box (router, 2, -4, 4, 4);
  g_assert_false (hl_router_find (router, &from, &to, NULL, 0, way));
  g_assert_cmpuint (way->len, >=, 2);
  g_assert_cmpint (point (way, 0)->x, ==, 0);
  g_assert_cmpint (point (way, way->len - 1)->x, ==, 20);
}

static void
test_field_has_a_largest_size (void)
{
  g_assert_null (hl_router_new (-1000000, -1000000, 1000000, 1000000));
  g_assert_null (hl_router_new (G_MININT, G_MININT, G_MAXINT, G_MAXINT));
}

int
main (int argc, char **argv)
{
  g_test_init (&argc, &argv, NULL);
  g_test_add_func ("/draw/router/facing-ports-are-joined-straight", test_facing_ports_are_joined_straight);
  g_test_add_func ("/draw/router/corner-needs-one-bend", test_corner_needs_one_bend);
  g_test_add_func ("/draw/router/port-that-looks-away-is-led-round", test_port_that_looks_away_is_led_round);
  g_test_add_func ("/draw/router/goes-round-a-box", test_goes_round_a_box);
  g_test_add_func ("/draw/router/second-line-keeps-off-the-first", test_second_line_keeps_off_the_first);
  g_test_add_func ("/draw/router/step-settles-in-the-middle", test_step_settles_in_the_middle);
  g_test_add_func ("/draw/router/hand-set-bends-are-passed", test_hand_set_bends_are_passed);
  g_test_add_func ("/draw/router/walled-in-port-gets-a-plain-way", test_walled_in_port_gets_a_plain_way);
  g_test_add_func ("/draw/router/field-has-a-largest-size", test_field_has_a_largest_size);
  return g_test_run ();
}
