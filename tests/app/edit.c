/* What the canvas can do to a plant: each edit does what it says, and what can be reversed comes back the same.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "app/hl-edit.h"

static const HlKind *
kind (const char *id)
{
  const HlKind *found = hl_kind_lookup (id);
  g_assert_nonnull (found);
  return found;
}

/* Takes @plant. */
static HlPlant *
add (HlPlant *plant, const char *kind_id, int x, int y, const char **id)
{
  HlPlant *next = hl_edit_add (plant, kind (kind_id), x, y, id);
  hl_plant_unref (plant);
  return next;
}

/* Takes @plant. */
static HlPlant *
join (HlPlant *plant, const char *a, const char *a_port, const char *b, const char *b_port)
{
  GError *error = NULL;
  HlPlant *next = hl_edit_connect (plant, a, a_port, b, b_port, NULL, &error);
  g_assert_no_error (error);
  hl_plant_unref (plant);
  return next;
}

/* Turbine, generator, condenser, pump; exhaust and condensate lines; one shaft. */
static HlPlant *
small_plant (void)
{
  GError *error = NULL;
  HlPlant *plant = hl_plant_new (), *next;
  plant = add (plant, "turbine", 20, 10, NULL);
  plant = add (plant, "generator", 30, 10, NULL);
  plant = add (plant, "condenser", 24, 20, NULL);
  plant = add (plant, "pump", 14, 24, NULL);
  plant = join (plant, "T1", "exhaust", "C1", "steam");
  plant = join (plant, "P1", "inlet", "C1", "condensate");
  next = hl_edit_join_shaft (plant, "T1", "G1", &error);
  g_assert_no_error (error);
  hl_plant_unref (plant);
  return next;
}

static const char *const all[] = { "T1", "G1", "C1", "P1" };

static void
test_a_line_runs_from_outlet_to_inlet_however_it_is_drawn (void)
{
  g_autoptr (HlPlant) plant = small_plant ();
  const HlStream *stream = hl_plant_stream_at (plant, "P1", "inlet");
  g_assert_nonnull (stream);
  g_assert_cmpstr (stream->from_id, ==, "C1");
  g_assert_cmpstr (stream->from_port, ==, "condensate");
  g_assert_cmpstr (stream->to_id, ==, "P1");
}

static void
test_a_line_that_cannot_be_is_refused_with_a_reason (void)
{
  g_autoptr (HlPlant) plant = small_plant ();
  GError *error = NULL;
  g_assert_null (hl_edit_connect (plant, "T1", "inlet", "C1", "drain", NULL, &error));      /* two inlets */
  g_assert_nonnull (error);
  g_assert_cmpuint (strlen (error->message), >, 10);
  g_clear_error (&error);
  g_assert_null (hl_edit_connect (plant, "T1", "exhaust", "P1", "inlet", NULL, &error));    /* both taken */
  g_assert_nonnull (error);
  g_clear_error (&error);
}

static void
test_moving_there_and_back_changes_nothing (void)
{
  g_autoptr (HlPlant) plant = small_plant ();
  g_autoptr (HlPlant) moved = hl_edit_move (plant, all, 2, 3, -4);
  g_autoptr (HlPlant) back = hl_edit_move (moved, all, 2, -3, 4);
  g_assert_cmpint (hl_plant_find_component (moved, "T1")->x, ==, 23);
  g_assert_cmpint (hl_plant_find_component (moved, "G1")->y, ==, 6);
  g_assert_cmpint (hl_plant_find_component (moved, "C1")->x, ==, 24);
  g_assert_false (hl_plant_equal (plant, moved));
  g_assert_true (hl_plant_equal (plant, back));
}

static void
test_labels_move_with_both_ends (void)
{
  g_autoptr (HlPlant) plant = small_plant ();
  const char *const pair[] = { "T1", "C1" };
  const char *exhaust = hl_plant_stream_at (plant, "T1", "exhaust")->id;
  g_autoptr (HlPlant) placed = hl_edit_place_label (plant, exhaust, TRUE, 25, 15);
  g_autoptr (HlPlant) both = hl_edit_move (placed, pair, 2, 5, 6);
  g_autoptr (HlPlant) one = hl_edit_move (placed, pair, 1, 5, 6);
  g_assert_cmpint (hl_plant_find_stream (both, exhaust)->label_x, ==, 30);
  g_assert_cmpint (hl_plant_find_stream (both, exhaust)->label_y, ==, 21);
  g_assert_cmpint (hl_plant_find_stream (one, exhaust)->label_x, ==, 25);
}

static void
test_four_turns_and_two_mirrors_are_none (void)
{
  g_autoptr (HlPlant) plant = small_plant ();
  for (guint n = 1; n <= G_N_ELEMENTS (all); n += 3)
    {
      g_autoptr (HlPlant) turned = hl_plant_ref (plant);
      g_autoptr (HlPlant) once = hl_edit_mirror (plant, all, n);
      g_autoptr (HlPlant) twice = hl_edit_mirror (once, all, n);
      for (int k = 0; k < 4; k++)
        {
          HlPlant *next = hl_edit_turn (turned, all, n);
          hl_plant_unref (turned);
          turned = next;
          g_assert_cmpint (hl_plant_equal (plant, turned), ==, k == 3);
        }
      g_assert_false (hl_plant_equal (plant, once));
      g_assert_true (hl_plant_equal (plant, twice));
    }
}

/* Left-right as seen: ports of the turned symbol change sides, too. */
static void
test_mirroring_a_turned_pump_swaps_left_and_right (void)
{
  g_autoptr (HlPlant) plant = small_plant ();
  const char *const pump[] = { "P1" };
  for (int turns = 0; turns < 4; turns++)
    {
      g_autoptr (HlPlant) turned = hl_plant_ref (plant), mirrored = NULL;
      const HlComponent *before, *after;
      for (int k = 0; k < turns; k++)
        {
          HlPlant *next = hl_edit_turn (turned, pump, 1);
          hl_plant_unref (turned);
          turned = next;
        }
      mirrored = hl_edit_mirror (turned, pump, 1);
      before = hl_plant_find_component (turned, "P1");
      after = hl_plant_find_component (mirrored, "P1");
      for (guint n = 0; n < hl_component_n_ports (before); n++)
        {
          int x0, y0, x1, y1;
          HlSide side0, side1;
          hl_component_port_place (before, n, &x0, &y0, &side0);
          hl_component_port_place (after, n, &x1, &y1, &side1);
          g_assert_cmpint (x1 - after->x, ==, before->x - x0);
          g_assert_cmpint (y1, ==, y0);
        }
    }
}

static void
test_duplicates_keep_the_lines_and_the_shaft_among_them (void)
{
  g_autoptr (HlPlant) plant = small_plant ();
  g_autoptr (GPtrArray) copies = g_ptr_array_new ();
  g_autoptr (HlPlant) doubled = hl_edit_duplicate (plant, all, G_N_ELEMENTS (all), 4, 4, copies);
  const HlStream *exhaust = hl_plant_stream_at (doubled, "T2", "exhaust");
  g_assert_cmpuint (copies->len, ==, 4);
  g_assert_cmpuint (hl_plant_n_components (doubled), ==, 8);
  g_assert_cmpuint (hl_plant_n_streams (doubled), ==, 4);
  g_assert_cmpuint (hl_plant_n_shafts (doubled), ==, 2);
  g_assert_nonnull (exhaust);
  g_assert_cmpstr (exhaust->to_id, ==, "C2");
  g_assert_true (hl_plant_shaft_of (doubled, "T2") == hl_plant_shaft_of (doubled, "G2"));
  g_assert_true (hl_plant_shaft_of (doubled, "T2") != hl_plant_shaft_of (doubled, "T1"));
}

static HlPlant *
with_tie (HlPlant *plant, HlAddress at, const char *text)
{
  HlValue value;
  GError *error = NULL;
  hl_value_parse (plant, &at, text, &value, &error);
  g_assert_no_error (error);
  HlPlant *tied = hl_plant_with_value (plant, &at, &value, &error);
  g_assert_no_error (error);
  hl_plant_unref (plant);
  return tied;
}

static char *
tie_of (const HlPlant *plant, HlAddress at)
{
  const HlValue *value = hl_plant_value (plant, &at);
  return value != NULL && value->origin == HL_ORIGIN_TIED ? hl_tie_format (plant, &at, value) : NULL;
}

/* Among the copies ties join the copies; one to what was not copied stays, and is found where a pasted plant lacks that. */
static void
test_copies_keep_their_ties (void)
{
  static const char *const two[] = { "T1", "C1" };
  HlAddress T1 = hl_address_component ("T1", "inlet.p"), T2 = hl_address_component ("T2", "inlet.p"), P1 = hl_address_component ("P1", "outlet.p");
  HlAddress C1 = hl_address_component ("C1", "subcooling"), C2 = hl_address_component ("C2", "subcooling");
  g_autoptr (HlPlant) plant = with_tie (with_tie (small_plant (), T1, "=900*C1.steam.p + 0.1*P1.outlet.p"), C1, "=C1.steam.T - T1.exhaust.T");
  g_autoptr (GPtrArray) copies = g_ptr_array_new (), pasted_ids = g_ptr_array_new (), moved_ids = g_ptr_array_new ();
  g_autoptr (HlPlant) doubled = hl_edit_duplicate (plant, two, 2, 4, 4, copies);
  g_autofree char *first = tie_of (doubled, T2), *second = tie_of (doubled, C2), *old = tie_of (doubled, T1);
  g_assert_cmpstr (first, ==, "900*C2.steam.p + 0.1*P1.outlet.p");
  g_assert_cmpstr (second, ==, "C2.steam.T - T2.exhaust.T");
  g_assert_cmpstr (old, ==, "900*C1.steam.p + 0.1*P1.outlet.p");
  g_assert_nonnull (hl_plant_quantity_kind (doubled, &P1));

  g_autoptr (HlPlant) clip = hl_edit_extract (plant, two, 2);
  g_autoptr (HlPlant) pasted = hl_edit_merge (plant, clip, 4, 4, pasted_ids);
  g_autofree char *same = tie_of (pasted, T2);
  g_assert_cmpstr (same, ==, "900*C2.steam.p + 0.1*P1.outlet.p");
  g_autoptr (HlPlant) empty = hl_plant_new (), moved = hl_edit_merge (empty, clip, 0, 0, moved_ids);
  g_assert_null (hl_plant_value (moved, &T1));
  g_autofree char *kept = tie_of (moved, C1);
  g_assert_cmpstr (kept, ==, "C1.steam.T - T1.exhaust.T");
}

/* A shaft is a line: what is joined to its first machine comes before it. */
static void
test_joined_side_by_side (void)
{
  g_autoptr (HlPlant) plant = add (add (small_plant (), "turbine", 10, 10, NULL), "gearbox", 14, 10, NULL);
  g_autoptr (HlPlant) geared = NULL, whole = NULL;
  GError *error = NULL;
  const char *const order[] = { "T2", "GB1", "T1", "G1" };

  geared = hl_edit_join_shaft (plant, "T2", "GB1", &error);
  g_assert_no_error (error);
  whole = hl_edit_join_shaft (geared, "T1", "GB1", &error);
  g_assert_no_error (error);
  const HlShaft *shaft = hl_plant_shaft_of (whole, "T1");
  g_assert_cmpuint (shaft->n_joins, ==, G_N_ELEMENTS (order));
  for (guint k = 0; k < shaft->n_joins; k++)
    g_assert_cmpstr (shaft->joins[k], ==, order[shaft->joins[0] == g_intern_string ("T2") ? k : shaft->n_joins - 1 - k]);
}

static void
test_shafts_merge_and_part (void)
{
  g_autoptr (HlPlant) plant = add (small_plant (), "turbine", 10, 10, NULL);
  g_autoptr (HlPlant) joined = NULL, parted = NULL, alone = NULL;
  GError *error = NULL;

  joined = hl_edit_join_shaft (plant, "T2", "G1", &error);
  g_assert_no_error (error);
  g_assert_cmpuint (hl_plant_n_shafts (joined), ==, 1);
  g_assert_cmpuint (hl_plant_shaft_of (joined, "T1")->n_joins, ==, 3);
  g_assert_null (hl_edit_join_shaft (joined, "T1", "T2", &error));     /* on one shaft already */
  g_assert_nonnull (error);
  g_clear_error (&error);
  g_assert_null (hl_edit_join_shaft (joined, "T1", "C1", &error));     /* a condenser has no shaft */
  g_assert_nonnull (error);
  g_clear_error (&error);
  parted = hl_edit_leave_shaft (joined, "T2", &error);
  g_assert_no_error (error);
  g_assert_cmpuint (hl_plant_shaft_of (parted, "T1")->n_joins, ==, 2);
  g_assert_null (hl_plant_shaft_of (parted, "T2"));
  alone = hl_edit_leave_shaft (parted, "T1", &error);                  /* a shaft of one is none */
  g_assert_no_error (error);
  g_assert_cmpuint (hl_plant_n_shafts (alone), ==, 0);
}

static void
test_a_valve_is_inserted_into_a_line (void)
{
  g_autoptr (HlPlant) plant = small_plant ();
  const char *line = hl_plant_stream_at (plant, "C1", "condensate")->id, *id;
  GError *error = NULL;
  g_autoptr (HlPlant) inserted = hl_edit_insert (plant, line, kind ("valve"), 18, 24, 2, &id, &error);
  g_assert_no_error (error);
  g_assert_cmpuint (hl_plant_n_streams (inserted), ==, 3);
  g_assert_cmpstr (hl_plant_stream_at (inserted, "C1", "condensate")->id, ==, line);
  g_assert_cmpstr (hl_plant_stream_at (inserted, "C1", "condensate")->to_id, ==, id);
  g_assert_cmpstr (hl_plant_stream_at (inserted, "P1", "inlet")->from_id, ==, id);
  g_assert_cmpint (hl_plant_find_component (inserted, id)->turn, ==, 2);
  g_assert_false (hl_edit_can_insert (kind ("generator")));
  g_assert_false (hl_edit_can_insert (kind ("turbine")));
  g_assert_null (hl_edit_insert (plant, line, kind ("generator"), 0, 0, 0, NULL, &error));
  g_assert_nonnull (error);
  g_clear_error (&error);
}

/* The side port of the junction looks towards the component, above as below the line. */
static void
test_a_line_may_end_in_another_one (void)
{
  for (int k = 0; k < 4; k++)
    {
      g_autoptr (HlPlant) plant = small_plant (), branched = NULL;
      gboolean is_above = k % 2 == 0, is_outlet = k / 2 == 0;
      const char *line = hl_plant_stream_at (plant, "C1", "condensate")->id, *valve, *junction;
      const HlStream *branch;
      GError *error = NULL;
      guint n;
      int x, y;
      HlSide side;

      plant = add (plant, "valve", 18, is_above ? 4 : 60, &valve);
      branched = hl_edit_branch (plant, valve, is_outlet ? "outlet" : "inlet", line, 19, 24, 2, &junction, &error);
      g_assert_no_error (error);
      g_assert_cmpstr (hl_plant_find_component (branched, junction)->kind->id, ==, is_outlet ? "mixer" : "splitter");
      branch = hl_plant_stream_at (branched, valve, is_outlet ? "outlet" : "inlet");
      g_assert_nonnull (branch);
      g_assert_cmpstr (is_outlet ? branch->to_id : branch->from_id, ==, junction);
      g_assert_cmpstr (hl_plant_stream_at (branched, "C1", "condensate")->to_id, ==, junction);
      g_assert_cmpstr (hl_plant_stream_at (branched, "P1", "inlet")->from_id, ==, junction);
      g_assert_true (hl_component_find_port (hl_plant_find_component (branched, junction), is_outlet ? "inlet2" : "outlet2", &n));
      hl_component_port_place (hl_plant_find_component (branched, junction), n, &x, &y, &side);
      g_assert_cmpint (side, ==, is_above ? HL_SIDE_UP : HL_SIDE_DOWN);
      g_assert_true (hl_component_find_port (hl_plant_find_component (branched, junction), is_outlet ? "inlet1" : "inlet", &n));
      hl_component_port_place (hl_plant_find_component (branched, junction), n, &x, &y, &side);
      g_assert_cmpint (side, ==, HL_SIDE_RIGHT);      /* the line runs to the left there */
    }
}

static void
test_a_free_place_is_free_and_near (void)
{
  g_autoptr (HlPlant) plant = small_plant ();
  const HlKind *pump = kind ("pump");
  int x = 20, y = 10, far_x = 500, far_y = 500;
  hl_edit_free_place (plant, pump, &x, &y);
  for (guint n = 0; n < hl_plant_n_components (plant); n++)
    {
      const HlComponent *other = hl_plant_component (plant, n);
      int hw, hh;
      hl_component_half_size (other, &hw, &hh);
      g_assert_true (ABS (other->x - x) >= hw + pump->half_width || ABS (other->y - y) >= hh + pump->half_height);
    }
  g_assert_cmpint (ABS (x - 20) + ABS (y - 10), <, 20);
  hl_edit_free_place (plant, pump, &far_x, &far_y);
  g_assert_cmpint (far_x, ==, 500);      /* what is free already stays */
  g_assert_cmpint (far_y, ==, 500);
}

static void
test_steps_are_named_after_what_they_touch (void)
{
  g_autoptr (HlPlant) plant = small_plant ();
  const char *stream[] = { hl_plant_stream (plant, 0)->id };
  g_autofree char *one = hl_edit_words (plant, all, 1), *two = hl_edit_words (plant, all, 2), *four = hl_edit_words (plant, all, 4);
  g_autofree char *line = hl_edit_words (plant, stream, 1);
  g_assert_cmpstr (one, ==, "T1");
  g_assert_cmpstr (two, ==, "T1 and G1");
  g_assert_cmpstr (four, ==, "4 items");
  g_assert_cmpstr (line, ==, "stream 1");
}

int
main (int argc, char **argv)
{
  g_test_init (&argc, &argv, NULL);
  g_test_add_func ("/app/edit/line-direction", test_a_line_runs_from_outlet_to_inlet_however_it_is_drawn);
  g_test_add_func ("/app/edit/line-refused", test_a_line_that_cannot_be_is_refused_with_a_reason);
  g_test_add_func ("/app/edit/move-back", test_moving_there_and_back_changes_nothing);
  g_test_add_func ("/app/edit/labels-move", test_labels_move_with_both_ends);
  g_test_add_func ("/app/edit/turns-and-mirrors", test_four_turns_and_two_mirrors_are_none);
  g_test_add_func ("/app/edit/mirror-turned", test_mirroring_a_turned_pump_swaps_left_and_right);
  g_test_add_func ("/app/edit/copies-keep-their-ties", test_copies_keep_their_ties);
  g_test_add_func ("/app/edit/duplicate", test_duplicates_keep_the_lines_and_the_shaft_among_them);
  g_test_add_func ("/app/edit/joined-side-by-side", test_joined_side_by_side);
  g_test_add_func ("/app/edit/shafts", test_shafts_merge_and_part);
  g_test_add_func ("/app/edit/insert", test_a_valve_is_inserted_into_a_line);
  g_test_add_func ("/app/edit/branch", test_a_line_may_end_in_another_one);
  g_test_add_func ("/app/edit/free-place", test_a_free_place_is_free_and_near);
  g_test_add_func ("/app/edit/words", test_steps_are_named_after_what_they_touch);
  return g_test_run ();
}
