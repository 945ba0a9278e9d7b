/* Components: defaults, options, ports and quantities by count.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "plant-test.h"

static HlComponent *
make (const char *kind)
{
  return hl_component_new (hl_kind_lookup (kind), "A1", 3, 4);
}

static void
test_new_component_carries_its_assumed_values (void)
{
  for (guint k = 0; k < hl_kind_count (); k++)
    {
      g_autoptr (HlComponent) component = hl_component_new (hl_kind_nth (k), "A1", 0, 0);
      g_autoptr (HlComponent) bare = hl_component_new_bare (hl_kind_nth (k), "A1", 0, 0);
      g_assert_cmpuint (bare->values.n, ==, 0);
      for (guint i = 0; i < hl_component_n_quantities (component); i++)
        {
          HlQuantity quantity = hl_component_quantity (component, i);
          const HlValue *value = hl_values_find (&component->values, quantity.key);
          g_assert_true ((value != NULL) == ((quantity.kind->flags & HL_QUANTITY_ASSUMED) != 0));
          g_assert_true (value == NULL || value->origin == HL_ORIGIN_ASSUMED);
        }
    }
}

/* Counts of the kinds as specified: a turbine has 2 + n ports, a condenser three without and five with water ... */
static void
test_ports_follow_the_options (void)
{
  static const struct { const char *kind, *option; int value; guint ports; const char *there, *not_there; } rows[] = {
    { "turbine", "extractions", 0, 2, "exhaust", "extraction1" },
    { "turbine", "extractions", 8, 10, "extraction8", "extraction9" },
    { "boiler", "reheats", 0, 2, "feed", "cold_reheat1" },
    { "boiler", "reheats", 2, 6, "hot_reheat2", "hot_reheat3" },
    { "condenser", "cooling", 0, 5, "cooling_inlet", "cooling" },
    { "condenser", "cooling", 1, 3, "drain", "cooling_inlet" },
    { "open_heater", "inlets", 6, 8, "inlet6", "inlet" },
    { "splitter", "outlets", 3, 4, "outlet3", "outlet4" },
    { "mixer", "inlets", 2, 3, "inlet2", "inlet3" },
    { "boundary", "direction", 0, 1, "outlet", "inlet" },
    { "boundary", "direction", 1, 1, "inlet", "outlet" },
  };
  for (gsize i = 0; i < G_N_ELEMENTS (rows); i++)
    {
      g_autoptr (HlComponent) component = make (rows[i].kind);
      guint n = 99;
      hl_component_set_option (component, rows[i].option, rows[i].value);
      g_assert_cmpuint (hl_component_n_ports (component), ==, rows[i].ports);
      g_assert_true (hl_component_find_port (component, rows[i].there, &n));
      g_assert_cmpstr (hl_component_port (component, n).key, ==, rows[i].there);
      g_assert_false (hl_component_find_port (component, rows[i].not_there, NULL));
    }
}

/* Every port and quantity that is listed is found by its key, which is interned. */
static void
test_lists_and_look_ups_agree (void)
{
  for (guint k = 0; k < hl_kind_count (); k++)
    {
      g_autoptr (HlComponent) component = hl_component_new (hl_kind_nth (k), "A1", 0, 0);
      for (guint i = 0; i < component->kind->n_options; i++)
        if (component->kind->options[i].choices == NULL)
          hl_component_set_option (component, component->kind->options[i].key, component->kind->options[i].most);
      for (guint i = 0; i < hl_component_n_ports (component); i++)
        {
          HlPort port = hl_component_port (component, i);
          g_autofree char *name = hl_component_port_name (component, i), *state = g_strconcat (port.key, ".p", NULL);
          guint n;
          g_assert_true (port.key == g_intern_string (port.key));
          g_assert_true (hl_component_find_port (component, port.key, &n));
          g_assert_cmpuint (n, ==, i);
          g_assert_cmpuint (strlen (name), >, 0);
          g_assert_cmpint (hl_component_quantity_kind (component, state)->dimension, ==, HL_DIMENSION_PRESSURE);
        }
      for (guint i = 0; i < hl_component_n_quantities (component); i++)
        {
          HlQuantity quantity = hl_component_quantity (component, i);
          g_autofree char *name = hl_component_quantity_name (component, i);
          g_assert_true (quantity.key == g_intern_string (quantity.key));
          g_assert_true (hl_component_quantity_kind (component, quantity.key) == quantity.kind);
          g_assert_cmpuint (strlen (name), >, 0);
        }
    }
}

static void
test_unknown_keys_have_no_kind (void)
{
  static const char *const keys[] = { "", ".", ".p", "inlet", "inlet.", "inlet.q", "nozzle.p", "extraction0.p", "extraction3.p", "extraction01.p",
                                      "extraction#.p", "group_efficiency", "group_efficiency4", "inlet.p.p", NULL };
  g_autoptr (HlComponent) turbine = make ("turbine");
  g_autofree char *longest = g_strnfill (500, 'x');
  g_autofree char *dotted = g_strconcat (longest, ".p", NULL);
  hl_component_set_option (turbine, "extractions", 2);
  for (int i = 0; keys[i] != NULL; i++)
    g_assert_null (hl_component_quantity_kind (turbine, keys[i]));
  g_assert_null (hl_component_quantity_kind (turbine, dotted));
  g_assert_nonnull (hl_component_quantity_kind (turbine, "group_efficiency3"));
  g_assert_nonnull (hl_component_quantity_kind (turbine, "extraction2.h"));
}

static void
test_options_clamp_and_tidy_values (void)
{
  HlValue given = { .origin = HL_ORIGIN_GIVEN, .value = 12e5 };
  g_autoptr (HlComponent) turbine = make ("turbine"), bare = hl_component_new_bare (hl_kind_lookup ("turbine"), "T2", 0, 0);
  hl_component_set_option (turbine, "extractions", 99);
  g_assert_cmpint (hl_component_option (turbine, "extractions"), ==, 8);
  hl_component_set_option (turbine, "extractions", 2);
  hl_component_set_value (turbine, "extraction2.p", &given);
  hl_component_set_value (turbine, "extraction1.T", &given);
  g_assert_cmpint (hl_values_find (&turbine->values, "extraction1.p")->origin, ==, HL_ORIGIN_ASSUMED);
  /* What vanishes loses its value, what stays keeps it, what appears gets its default. */
  hl_component_set_option (turbine, "extractions", 1);
  g_assert_null (hl_values_find (&turbine->values, "extraction2.p"));
  g_assert_nonnull (hl_values_find (&turbine->values, "extraction1.T"));
  hl_component_set_option (turbine, "extractions", 2);
  g_assert_cmpfloat (hl_values_find (&turbine->values, "extraction2.p")->value, ==, 2.5e5);
  hl_component_set_option (turbine, "extractions", -5);
  g_assert_cmpint (hl_component_option (turbine, "extractions"), ==, 0);
  g_assert_null (hl_values_find (&turbine->values, "extraction1.T"));
  /* A component without any value stays so. */
  hl_component_set_option (bare, "extractions", 3);
  g_assert_cmpuint (bare->values.n, ==, 0);
  g_assert_cmpint (hl_component_option (bare, "no such option"), ==, 0);
}

static void
test_copies_are_independent (void)
{
  HlValue given = { .origin = HL_ORIGIN_GIVEN, .value = 0.5 };
  g_autoptr (HlComponent) one = make ("turbine"), two = NULL;
  hl_component_set_name (one, "first");
  one->extra = json_object_new ();
  two = hl_component_copy (one);
  hl_component_set_name (two, NULL);
  hl_component_set_option (two, "extractions", 3);
  hl_component_set_value (two, "isentropic_efficiency", &given);
  hl_component_set_value (two, "inlet.p", NULL);
  g_assert_cmpstr (one->name, ==, "first");
  g_assert_cmpstr (two->name, ==, "");
  g_assert_cmpint (hl_component_option (one, "extractions"), ==, 0);
  g_assert_cmpfloat (hl_values_find (&one->values, "isentropic_efficiency")->value, ==, 0.83);
  g_assert_nonnull (hl_values_find (&one->values, "inlet.p"));
  g_assert_null (hl_values_find (&two->values, "inlet.p"));
}

int
main (int argc, char **argv)
{
  g_test_init (&argc, &argv, NULL);
  g_test_add_func ("/component/new-component-carries-its-assumed-values", test_new_component_carries_its_assumed_values);
  g_test_add_func ("/component/ports-follow-the-options", test_ports_follow_the_options);
  g_test_add_func ("/component/lists-and-look-ups-agree", test_lists_and_look_ups_agree);
  g_test_add_func ("/component/unknown-keys-have-no-kind", test_unknown_keys_have_no_kind);
  g_test_add_func ("/component/options-clamp-and-tidy-values", test_options_clamp_and_tidy_values);
  g_test_add_func ("/component/copies-are-independent", test_copies_are_independent);
  return g_test_run ();
}
