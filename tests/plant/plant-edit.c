/* Edits: what they change, what they take with them, and that the old plant stays.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "plant/plant-private.h"
#include "plant-test.h"

/* Runs an edit and asserts that the old plant still reads as before and shares what the edit left alone. */
#define EDIT(edited, plant, call) \
  g_autofree char *before_##edited = hl_plant_to_json (plant); \
  g_autoptr (HlPlant) edited = call; \
  g_autofree char *after_##edited = hl_plant_to_json (plant); \
  g_assert_cmpstr (before_##edited, ==, after_##edited); \
  g_assert_nonnull (edited)

static void
test_header_edits (void)
{
  g_autoptr (HlPlant) plant = loop_plant ();
  HlSite site = *hl_plant_site (plant);
  site.altitude = 500.0;
  EDIT (titled, plant, hl_plant_with_title (plant, "Other"));
  EDIT (us, plant, hl_plant_with_units (plant, HL_UNITS_US));
  EDIT (high, plant, hl_plant_with_site (plant, &site));
  g_assert_cmpstr (hl_plant_title (titled), ==, "Other");
  g_assert_cmpint (hl_plant_units (us), ==, HL_UNITS_US);
  g_assert_cmpfloat (hl_plant_site (high)->altitude, ==, 500.0);
  g_assert_true (hl_plant_component (titled, 0) == hl_plant_component (plant, 0));
  g_assert_false (hl_plant_equal (titled, plant));
  g_assert_false (hl_plant_equal (us, plant));
  g_assert_false (hl_plant_equal (high, plant));
}

static void
test_value_edit_shares_the_rest (void)
{
  g_autoptr (HlPlant) plant = loop_plant ();
  HlAddress efficiency = address (plant, "T1.isentropic_efficiency");
  EDIT (edited, plant, with_given (plant, "T1.isentropic_efficiency", 0.87));
  g_assert_cmpfloat (hl_plant_value (edited, &efficiency)->value, ==, 0.87);
  g_assert_cmpint (hl_plant_value (edited, &efficiency)->origin, ==, HL_ORIGIN_GIVEN);
  for (guint i = 0; i < hl_plant_n_components (plant); i++)
    g_assert_true ((hl_plant_component (plant, i) == hl_plant_component (edited, i)) == (i != 1));
  for (guint i = 0; i < hl_plant_n_streams (plant); i++)
    g_assert_true (hl_plant_stream (plant, i) == hl_plant_stream (edited, i));
}

/* A state has one value, whichever name it was typed under. */
static void
test_value_edit_moves_between_names_of_one_state (void)
{
  g_autoptr (HlPlant) plant = loop_plant ();
  HlAddress at_turbine = address (plant, "T1.inlet.p"), at_stream = address (plant, "p:live"), at_boiler = address (plant, "B1.steam.p");
  GError *error = NULL;
  EDIT (first, plant, with_given (plant, "p:live", 70e5));
  EDIT (second, first, with_given (first, "B1.steam.p", 71e5));
  EDIT (free_again, second, hl_plant_with_value (second, &at_turbine, NULL, &error));
  g_assert_no_error (error);
  g_assert_null (hl_plant_value (first, &at_turbine));
  g_assert_cmpfloat (hl_plant_value (first, &at_stream)->value, ==, 70e5);
  g_assert_null (hl_plant_value (second, &at_stream));
  g_assert_cmpfloat (hl_plant_value (second, &at_boiler)->value, ==, 71e5);
  g_assert_null (hl_plant_value_wherever (free_again, &at_stream, NULL));
}

static void
test_plant_value_edit (void)
{
  g_autoptr (HlPlant) plant = loop_plant ();
  HlAddress net = hl_address_plant ("net_power");
  EDIT (edited, plant, with_given (plant, "plant.net_power", 5e6));
  EDIT (freed, edited, hl_plant_with_value (edited, &net, NULL, NULL));
  g_assert_cmpfloat (hl_plant_value (edited, &net)->value, ==, 5e6);
  g_assert_null (hl_plant_value (freed, &net));
}

static void
test_refused_values (void)
{
  static const struct { const char *key; double value; const char *says; } rows[] = {
    { "isentropic_efficiency", 1.4, "T1.isentropic_efficiency is 1.4: the quantity “Isentropic efficiency” must lie above 0 and be at most 1" },
    { "isentropic_efficiency", 0.0, "must lie above 0" },
    { "isentropic_efficiency", -0.1, "must lie above 0" },
    { "inlet.p", -1e5, "must lie above 0 and be at most 10000 bar" },
    { "inlet.T", 0.0, "must lie above absolute zero and be at most 2726.85 °C" },
    { "inlet.h", 1e8, "must lie above -10000 kJ/kg and be at most 10000 kJ/kg" },
    { "inlet.x", -0.01, "must be 0 or more and at most 1" },
    { "inlet.x", NAN, "is not a finite number" },
    { "inlet.m", INFINITY, "is not a finite number" },
  };
  g_autoptr (HlPlant) plant = loop_plant ();
  HlAddress unknown = hl_address_component ("Z9", "power");
  HlValue value = { .origin = HL_ORIGIN_GIVEN, .value = 1.0 };
  GError *error = NULL;
  for (gsize i = 0; i < G_N_ELEMENTS (rows); i++)
    {
      HlAddress a = hl_address_component ("T1", rows[i].key);
      value.value = rows[i].value;
      g_assert_null (hl_plant_with_value (plant, &a, &value, &error));
      g_assert_true (g_error_matches (error, HL_PLANT_ERROR, HL_PLANT_ERROR_OUT_OF_RANGE));
      assert_message (&error, rows[i].says);
    }
  g_assert_null (hl_plant_with_value (plant, &unknown, &value, &error));
  g_assert_true (g_error_matches (error, HL_PLANT_ERROR, HL_PLANT_ERROR_ADDRESS));
  assert_message (&error, "no quantity Z9.power");
}

static void
test_component_edit_drops_what_lost_its_end (void)
{
  g_autoptr (HlPlant) plant = loop_plant ();
  HlComponent *turbine = hl_component_copy (hl_plant_find_component (plant, "T1"));
  HlComponent *moved = hl_component_copy (hl_plant_find_component (plant, "C1"));
  HlAddress flow = address (plant, "m:4");
  HlAddress of = address (plant, "T1.extraction1.m");
  HlValue tie = { .origin = HL_ORIGIN_TIED, .tie = hl_tie_linear (&of, 2.0, 0.0) };
  GError *error = NULL;
  EDIT (tied, plant, hl_plant_with_value (plant, &flow, &tie, &error));
  moved->x += 3;
  hl_component_set_option (turbine, "extractions", 0);
  {
    EDIT (shorter, tied, hl_plant_with_component (tied, turbine));
    EDIT (shifted, tied, hl_plant_with_component (tied, moved));
    /* The extraction line goes; a mere move takes nothing.  The tie to its flow stays, to be named in a finding. */
    g_assert_null (hl_plant_find_stream (shorter, "5"));
    g_assert_cmpuint (hl_plant_n_streams (shorter), ==, 6);
    g_assert_nonnull (hl_plant_value (shorter, &flow));
    g_assert_null (hl_plant_stream_at (shorter, "D1", "steam"));
    g_assert_cmpuint (hl_plant_n_streams (shifted), ==, 7);
    g_assert_nonnull (hl_plant_value (shifted, &flow));
    g_assert_cmpint (hl_plant_find_component (shifted, "C1")->x, ==, 27);
  }
}

static void
test_adding_components_and_streams (void)
{
  g_autoptr (HlPlant) empty = hl_plant_new ();
  EDIT (one, empty, hl_plant_with_component (empty, hl_component_new (hl_kind_lookup ("boiler"), "B1", 0, 0)));
  EDIT (two, one, hl_plant_with_component (one, hl_component_new (hl_kind_lookup ("turbine"), "T1", 9, 0)));
  EDIT (three, two, hl_plant_with_component (two, hl_component_new (hl_kind_lookup ("pipe"), "L1", 9, 0)));
  EDIT (joined, three, hl_plant_with_stream (three, hl_stream_new ("1", "B1", "steam", "T1", "inlet")));
  EDIT (rerouted, joined, hl_plant_with_stream (joined, hl_stream_new ("2", "B1", "steam", "L1", "inlet")));
  EDIT (replaced, joined, hl_plant_with_stream (joined, hl_stream_new ("1", "L1", "outlet", "T1", "inlet")));
  g_assert_cmpuint (hl_plant_n_components (three), ==, 3);
  g_assert_cmpstr (hl_plant_stream_at (joined, "T1", "inlet")->id, ==, "1");
  /* A port holds one line: the former goes. */
  g_assert_cmpuint (hl_plant_n_streams (rerouted), ==, 1);
  g_assert_null (hl_plant_stream_at (rerouted, "T1", "inlet"));
  g_assert_cmpuint (hl_plant_n_streams (replaced), ==, 1);
  g_assert_null (hl_plant_stream_at (replaced, "B1", "steam"));
  g_assert_cmpstr (hl_plant_stream_at (replaced, "L1", "outlet")->id, ==, "1");
}

static void
test_removal_takes_attached_things_along (void)
{
  const char *turbine[] = { "T1", NULL }, *several[] = { "S1", "2", "unknown", NULL };
  g_autoptr (HlPlant) plant = loop_plant ();
  HlAddress flow = address (plant, "m:4");
  EDIT (without, plant, hl_plant_without (plant, turbine));
  EDIT (less, plant, hl_plant_without (plant, several));
  g_assert_null (hl_plant_find_component (without, "T1"));
  g_assert_cmpuint (hl_plant_n_streams (without), ==, 4);
  g_assert_cmpuint (hl_plant_n_shafts (without), ==, 0);   /* one alone needs no shaft */
  g_assert_nonnull (hl_plant_value (without, &flow));      /* tied to the exhaust's flow, and says so */
  g_assert_cmpuint (hl_plant_n_shafts (less), ==, 0);
  g_assert_cmpuint (hl_plant_n_streams (less), ==, 6);
  g_assert_nonnull (hl_plant_value (less, &flow));
  g_assert_cmpuint (hl_plant_n_components (less), ==, 7);
}

static char *
tie_at (const HlPlant *plant, const char *text)
{
  HlAddress at = address (plant, text);
  const HlValue *value = hl_plant_value (plant, &at);
  return value != NULL && value->origin == HL_ORIGIN_TIED ? hl_tie_to_text (value) : NULL;
}

static HlPlant *
with_tie (const HlPlant *plant, const char *text, const char *tie)
{
  HlAddress at = address (plant, text);
  HlValue value;
  GError *error = NULL;
  hl_value_parse (plant, &at, tie, &value, &error);
  g_assert_no_error (error);
  HlPlant *tied = hl_plant_with_value (plant, &at, &value, &error);
  g_assert_no_error (error);
  return tied;
}

#define assert_tie(plant, at, expected) \
  G_STMT_START { g_autofree char *tie_text = tie_at (plant, at); g_assert_cmpstr (tie_text, ==, expected); } G_STMT_END

static void
test_a_tie_keeps_what_was_typed (void)
{
  g_autoptr (HlPlant) plant = loop_plant ();
  HlAddress of = address (plant, "C1.steam.p"), two = address (plant, "m:2"), gone = hl_address_component ("Z9", "power"), p = address (plant, "P1.outlet.p");
  HlValue value = { .origin = HL_ORIGIN_TIED, .tie = hl_tie_linear (&of, 2.0, 1e4) };
  GError *error = NULL;
  EDIT (tied, plant, hl_plant_with_value (plant, &p, &value, &error));
  g_autofree char *shown = hl_tie_format (tied, &p, hl_plant_value (tied, &p));
  g_assert_cmpstr (shown, ==, "2*C1.steam.p + 0.1 bar");
  value.tie = hl_tie_linear (&two, 1.0, 0.0);
  g_assert_null (hl_plant_with_value (plant, &p, &value, &error));
  assert_message (&error, "comes out as a mass flow, but a pressure is wanted");
  value.tie = hl_tie_linear (&gone, 1.0, 0.0);
  EDIT (broken, plant, hl_plant_with_value (plant, &p, &value, &error));
  assert_tie (broken, "P1.outlet.p", "Z9.power");      /* a finding will say so */
}

/* Lines, shaft and ties follow a new id. */
static void
test_a_new_id (void)
{
  g_autoptr (HlPlant) plant = loop_plant ();
  g_autoptr (HlPlant) one = with_tie (plant, "P1.outlet.p", "=max(0.1*T1.inlet.p; C1.steam.p) + T1.exhaust.p");
  g_autoptr (HlPlant) two = with_tie (one, "plant.gross_power", "=T1.power - P2.power");
  GError *error = NULL;
  g_autoptr (HlPlant) renamed = hl_plant_with_id (two, "T1", "HP", &error);
  g_assert_no_error (error);
  g_assert_null (hl_plant_find_component (renamed, "T1"));
  g_assert_cmpint (hl_plant_component_index (renamed, "HP"), ==, hl_plant_component_index (plant, "T1"));
  g_assert_cmpstr (hl_plant_stream_at (renamed, "HP", "inlet")->id, ==, "live");
  g_assert_cmpstr (hl_plant_stream_at (renamed, "HP", "exhaust")->from_id, ==, "HP");
  g_assert_cmpstr (hl_plant_shaft_of (renamed, "HP")->id, ==, "S1");
  assert_tie (renamed, "P1.outlet.p", "max(0.1*HP.inlet.p;C1.steam.p)+HP.exhaust.p");
  assert_tie (renamed, "plant.gross_power", "HP.power-P2.power");
  g_autoptr (HlPlant) stream = hl_plant_with_id (renamed, "2", "wet", &error);
  g_assert_no_error (error);
  assert_tie (stream, "m:4", "0.9*wet.m");
  g_autoptr (HlPlant) back = hl_plant_with_id (stream, "wet", "2", NULL), again = hl_plant_with_id (back, "HP", "T1", NULL);
  g_assert_true (hl_plant_equal (again, two));
  g_assert_null (hl_plant_with_id (two, "T1", "C1", &error));
  assert_message (&error, "“C1” is the id of something else already");
  g_assert_null (hl_plant_with_id (two, "T1", "high pressure", &error));
  assert_message (&error, "“high pressure” is no id");
  g_assert_null (hl_plant_with_id (two, "T1", "1", &error));
  assert_message (&error, "“1” is no id");
  g_assert_null (hl_plant_with_id (two, "Z9", "Y9", &error));
  assert_message (&error, "there is no “Z9”");
}

static void
swap_pumps (HlAddress *at, gpointer data)
{
  if (g_str_equal (at->id, "P1"))
    at->id = g_intern_static_string (data);
}

static void
test_ties_are_mapped (void)
{
  const char *ids[] = { "C1", NULL };
  g_autoptr (HlPlant) plant = loop_plant ();
  g_autoptr (HlPlant) one = with_tie (plant, "C1.steam.p", "=0.01*P1.outlet.p + 0.01*D1.steam.p");
  g_autoptr (HlPlant) two = with_tie (one, "T1.extraction1.p", "=0.5*P1.outlet.p");
  g_autoptr (HlPlant) mapped = hl_plant_with_ties_mapped (two, ids, swap_pumps, (gpointer) "P2");
  assert_tie (mapped, "C1.steam.p", "0.01*P2.outlet.p+0.01*D1.steam.p");
  assert_tie (mapped, "T1.extraction1.p", "0.5*P1.outlet.p");
  /* What is not there, or has no such pressure, cannot be followed. */
  g_autoptr (HlPlant) lost = hl_plant_with_ties_mapped (two, ids, swap_pumps, (gpointer) "Z9");
  assert_tie (lost, "C1.steam.p", NULL);
  assert_tie (lost, "T1.extraction1.p", "0.5*P1.outlet.p");
}

static void
test_a_component_is_on_one_shaft (void)
{
  const char *three[] = { "T1", "P2", "G1" }, *two[] = { "T1", "P1" };
  g_autoptr (HlPlant) plant = loop_plant ();
  EDIT (longer, plant, hl_plant_with_shaft (plant, hl_shaft_new ("S1", three, 3)));
  EDIT (moved, longer, hl_plant_with_shaft (longer, hl_shaft_new ("S2", two, 2)));
  EDIT (gone, plant, hl_plant_with_shaft (plant, hl_shaft_new ("S2", two, 2)));
  g_assert_cmpuint (hl_plant_shaft_of (longer, "P2")->n_joins, ==, 3);
  g_assert_cmpstr (hl_plant_shaft_of (moved, "T1")->id, ==, "S2");
  g_assert_cmpstr (hl_plant_shaft_of (moved, "G1")->id, ==, "S1");
  g_assert_cmpuint (hl_plant_shaft_of (moved, "G1")->n_joins, ==, 2);
  g_assert_cmpuint (hl_plant_n_shafts (gone), ==, 1);
  g_assert_null (hl_plant_shaft_of (gone, "G1"));
}

static void
test_free_ids (void)
{
  g_autoptr (HlPlant) plant = loop_plant ();
  g_autofree char *turbine = hl_plant_free_id (plant, "T"), *stream = hl_plant_free_id (plant, ""), *pump = hl_plant_free_id (plant, "P");
  g_autofree char *shaft = hl_plant_free_id (plant, "S");
  g_assert_cmpstr (turbine, ==, "T2");
  g_assert_cmpstr (stream, ==, "1");   /* the live steam line has a name */
  g_assert_cmpstr (pump, ==, "P3");
  g_assert_cmpstr (shaft, ==, "S2");
}

static void
test_connections (void)
{
  static const struct { const char *from, *from_port, *to, *to_port, *says; } rows[] = {
    { "Z9", "steam", "T1", "inlet", "There is no component “Z9”" },
    { "V1", "outlet", "Z9", "inlet", "There is no component “Z9”" },
    { "B1", "vapour", "P1", "inlet", "B1 (Fired boiler) has no port “vapour”; it has feed, steam" },
    { "G1", "out", "P1", "inlet", "it has none" },
    { "B1", "feed", "P1", "inlet", "B1.feed is an inlet; a line starts at an outlet" },
    { "V1", "outlet", "T1", "exhaust", "T1.exhaust is an outlet; a line ends at an inlet" },
    { "B1", "steam", "V1", "inlet", "B1.steam already has line live; put a splitter" },
    { "V1", "outlet", "T1", "inlet", "T1.inlet already has line live; put a splitter or a mixer" },
    { "V1", "outlet", "V1", "inlet", "V1 cannot feed itself" },
    { "B2", "hot_reheat1", "B2", "cold_reheat1", "B2 cannot feed itself" },
  };
  g_autoptr (HlPlant) plant = loop_plant ();
  HlComponent *boiler = hl_component_new (hl_kind_lookup ("boiler"), "B2", 0, 0);
  EDIT (valve, plant, hl_plant_with_component (plant, hl_component_new (hl_kind_lookup ("valve"), "V1", 0, 0)));
  hl_component_set_option (boiler, "reheats", 2);
  {
    EDIT (more, valve, hl_plant_with_component (valve, boiler));
    GError *error = NULL;
    for (gsize i = 0; i < G_N_ELEMENTS (rows); i++)
      {
        g_assert_false (hl_plant_can_connect (more, rows[i].from, rows[i].from_port, rows[i].to, rows[i].to_port, &error));
        assert_message (&error, rows[i].says);
      }
    g_assert_true (hl_plant_can_connect (more, "V1", "outlet", "B2", "feed", &error));
    /* The two reheats of one boiler are two sides, and so are feed and reheat. */
    g_assert_true (hl_plant_can_connect (more, "B2", "hot_reheat1", "B2", "cold_reheat2", &error));
    g_assert_true (hl_plant_can_connect (more, "B2", "steam", "B2", "cold_reheat1", &error));
    g_assert_no_error (error);
  }
}

/* Law: undoing a random series of edits step by step gives each former plant back, and they all stay valid. */
static void
test_history_of_random_edits (void)
{
  GRand *rand = g_rand_new_with_seed (99);
  g_autoptr (GPtrArray) plants = g_ptr_array_new_with_free_func ((GDestroyNotify) hl_plant_unref);
  g_autoptr (GPtrArray) texts = g_ptr_array_new_with_free_func (g_free);
  g_ptr_array_add (plants, loop_plant ());
  for (int step = 0; step < 300; step++)
    {
      HlPlant *now = plants->pdata[plants->len - 1], *next = NULL;
      guint n = hl_plant_n_components (now), pick = n > 0 ? (guint) g_rand_int_range (rand, 0, (int) n) : 0;
      g_autofree char *id = NULL;
      const char *gone[] = { NULL, NULL };
      HlComponent *copy;
      g_ptr_array_add (texts, hl_plant_to_json (now));
      switch (g_rand_int_range (rand, 0, n > 0 ? 4 : 1))
        {
        case 0:
          {
            const HlKind *kind = hl_kind_nth ((guint) g_rand_int_range (rand, 0, (int) hl_kind_count ()));
            id = hl_plant_free_id (now, kind->letter);
            next = hl_plant_with_component (now, hl_component_new (kind, id, step, -step));
            break;
          }
        case 1:
          gone[0] = hl_plant_component (now, pick)->id;
          next = hl_plant_without (now, gone);
          break;
        case 2:
          copy = hl_component_copy (hl_plant_component (now, pick));
          for (guint i = 0; i < copy->kind->n_options; i++)
            hl_component_set_option (copy, copy->kind->options[i].key, g_rand_int_range (rand, -1, 10));
          next = hl_plant_with_component (now, copy);
          break;
        default:
          {
            const HlComponent *from = hl_plant_component (now, pick), *to = hl_plant_component (now, (guint) g_rand_int_range (rand, 0, (int) n));
            for (guint i = 0; i < hl_component_n_ports (from) && next == NULL; i++)
              for (guint j = 0; j < hl_component_n_ports (to) && next == NULL; j++)
                if (hl_plant_can_connect (now, from->id, hl_component_port (from, i).key, to->id, hl_component_port (to, j).key, NULL))
                  {
                    id = hl_plant_free_id (now, "");
                    next = hl_plant_with_stream (now, hl_stream_new (id, from->id, hl_component_port (from, i).key, to->id, hl_component_port (to, j).key));
                  }
            break;
          }
        }
      g_ptr_array_add (plants, next != NULL ? next : hl_plant_ref (now));
    }
  for (guint i = texts->len; i-- > 0;)
    {
      g_autofree char *text = hl_plant_to_json (plants->pdata[i]);
      g_autoptr (HlPlant) again = NULL;
      GError *error = NULL;
      g_assert_cmpstr (text, ==, texts->pdata[i]);
      again = hl_plant_from_json (text, -1, "again", &error);
      g_assert_no_error (error);
      g_assert_true (hl_plant_equal (again, plants->pdata[i]));
    }
  g_rand_free (rand);
}

/* Two thousand components: an edit stays a matter of copying pointers (about 30 us; the limit leaves room for
 * slow machines and debuggers). */
static void
test_edits_of_a_large_plant_are_quick (void)
{
  HlPlant *plant = hl_plant_new ();
  gint64 start;
  for (int i = 0; i < 2000; i++)
    {
      g_autofree char *id = g_strdup_printf ("L%d", i + 1);
      HlPlant *next = hl_plant_with_component (plant, hl_component_new (hl_kind_lookup ("pipe"), id, i, 0));
      hl_plant_unref (plant);
      plant = next;
    }
  start = g_get_monotonic_time ();
  for (int i = 0; i < 100; i++)
    {
      HlPlant *next = with_given (plant, "L1000.pressure_loss", 0.001 * i);
      hl_plant_unref (plant);
      plant = next;
    }
  g_test_message ("%.1f us a value edit of 2000 components", (double) (g_get_monotonic_time () - start) / 100.0);
  g_assert_cmpint (g_get_monotonic_time () - start, <, 2 * G_USEC_PER_SEC);
  hl_plant_unref (plant);
}

int
main (int argc, char **argv)
{
  g_test_init (&argc, &argv, NULL);
  g_test_add_func ("/plant-edit/header-edits", test_header_edits);
  g_test_add_func ("/plant-edit/value-edit-shares-the-rest", test_value_edit_shares_the_rest);
  g_test_add_func ("/plant-edit/value-edit-moves-between-names-of-one-state", test_value_edit_moves_between_names_of_one_state);
  g_test_add_func ("/plant-edit/plant-value-edit", test_plant_value_edit);
  g_test_add_func ("/plant-edit/refused-values", test_refused_values);
  g_test_add_func ("/plant-edit/component-edit-drops-what-lost-its-end", test_component_edit_drops_what_lost_its_end);
  g_test_add_func ("/plant-edit/adding-components-and-streams", test_adding_components_and_streams);
  g_test_add_func ("/plant-edit/removal-takes-attached-things-along", test_removal_takes_attached_things_along);
  g_test_add_func ("/plant-edit/a-component-is-on-one-shaft", test_a_component_is_on_one_shaft);
  g_test_add_func ("/plant-edit/a-tie-keeps-what-was-typed", test_a_tie_keeps_what_was_typed);
  g_test_add_func ("/plant-edit/a-new-id", test_a_new_id);
  g_test_add_func ("/plant-edit/ties-are-mapped", test_ties_are_mapped);
  g_test_add_func ("/plant-edit/free-ids", test_free_ids);
  g_test_add_func ("/plant-edit/connections", test_connections);
  g_test_add_func ("/plant-edit/history-of-random-edits", test_history_of_random_edits);
  g_test_add_func ("/plant-edit/edits-of-a-large-plant-are-quick", test_edits_of_a_large_plant_are_quick);
  return g_test_run ();
}
