/* Tables of kinds and quantities: what must hold for every row.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "plant-test.h"

static void
check_quantity (const char *owner, const HlQuantityKind *q)
{
  g_test_message ("%s %s", owner, q->key);
  g_assert_cmpuint (strlen (q->sign), >, 0);
  g_assert_cmpuint (strlen (q->name), >, 0);
  g_assert_cmpuint (strlen (q->group), >, 0);
  g_assert_true (g_ascii_isupper (q->name[0]));
  g_assert_cmpuint (strlen (q->help), >, 10);
  g_assert_true (g_str_has_suffix (q->help, "."));
  g_assert_cmpint (q->dimension, <, HL_N_DIMENSIONS);
  g_assert_cmpfloat (q->above, <, q->at_most);
  /* A range is either there or not; a default lies in it, and has a source. */
  g_assert_true (isnan (q->credible_low) == isnan (q->credible_high));
  if (!isnan (q->credible_low))
    g_assert_cmpfloat (q->credible_low, <, q->credible_high);
  g_assert_true (isnan (q->default_value) == (q->default_source == NULL));
  if (!isnan (q->default_value))
    {
      g_assert_cmpfloat (q->default_value, >, q->above);
      g_assert_cmpfloat (q->default_value, <=, q->at_most);
      g_assert_cmpuint (strlen (q->default_source), >, 5);
      if (!isnan (q->credible_low))
        {
          g_assert_cmpfloat (q->default_value, >=, q->credible_low);
          g_assert_cmpfloat (q->default_value, <=, q->credible_high);
        }
    }
  if (q->flags & HL_QUANTITY_ASSUMED)
    {
      g_assert_false (isnan (q->default_value));
      g_assert_cmpint (q->yield_rank, >, 0);
    }
  g_assert_true (!(q->flags & HL_QUANTITY_PERCENT) || q->dimension == HL_DIMENSION_RATIO);
  g_assert_true ((strchr (q->key, '#') != NULL) == (q->repeat != NULL));
}

static void
test_rows_are_complete (void)
{
  guint n;
  const HlQuantityKind *quantities = hl_stream_quantities (&n);
  g_assert_cmpuint (n, ==, 8);
  for (guint i = 0; i < n; i++)
    check_quantity ("stream", &quantities[i]);
  quantities = hl_plant_quantities (&n);
  for (guint i = 0; i < n; i++)
    {
      check_quantity ("plant", &quantities[i]);
      g_assert_true (hl_plant_quantity_lookup (quantities[i].key) == &quantities[i]);
    }
  quantities = hl_common_quantities (&n);
  for (guint i = 0; i < n; i++)
    {
      check_quantity ("component", &quantities[i]);
      g_assert_true (quantities[i].flags & HL_QUANTITY_DERIVED);
    }
  for (guint k = 0; k < hl_kind_count (); k++)
    {
      const HlKind *kind = hl_kind_nth (k);
      g_assert_true (hl_kind_lookup (kind->id) == kind);
      g_assert_true (strlen (kind->letter) == 1 || strlen (kind->letter) == 2);
      g_assert_true (g_str_has_suffix (kind->help, "."));
      g_assert_cmpuint (strlen (kind->shelf_group), >, 0);
      for (guint i = 0; i < kind->n_quantities; i++)
        {
          check_quantity (kind->id, &kind->quantities[i]);
          g_assert_true (kind->quantities[i].repeat == NULL || hl_kind_find_option (kind, kind->quantities[i].repeat) >= 0);
          g_assert_true (kind->quantities[i].when_option == NULL || hl_kind_find_option (kind, kind->quantities[i].when_option) >= 0);
          for (guint j = 0; j < i; j++)
            g_assert_cmpstr (kind->quantities[i].key, !=, kind->quantities[j].key);
        }
      for (guint j = 0; j < k; j++)
        {
          g_assert_cmpstr (kind->id, !=, hl_kind_nth (j)->id);
          g_assert_cmpstr (kind->letter, !=, hl_kind_nth (j)->letter);
        }
    }
  g_assert_null (hl_kind_lookup ("teapot"));
  g_assert_null (hl_plant_quantity_lookup ("teapot"));
  g_assert_null (hl_stream_quantity_lookup ("q"));
}

static void
test_ports_and_options_are_complete (void)
{
  static const char *const reserved[] = { "id", "kind", "name", "at", "turn", "mirror", "given", "assumed", "tied", NULL };
  for (guint k = 0; k < hl_kind_count (); k++)
    {
      const HlKind *kind = hl_kind_nth (k);
      for (guint i = 0; i < kind->n_options; i++)
        {
          const HlOptionKind *option = &kind->options[i];
          g_assert_cmpint (option->least, <=, option->usual);
          g_assert_cmpint (option->usual, <=, option->most);
          g_assert_false (g_strv_contains (reserved, option->key));
          if (option->choices != NULL)
            {
              g_assert_cmpuint (g_strv_length ((char **) option->choices), ==, option->most + 1);
              g_assert_cmpuint (g_strv_length ((char **) option->choice_names), ==, option->most + 1);
            }
        }
      for (guint i = 0; i < kind->n_ports; i++)
        {
          const HlPortKind *port = &kind->ports[i];
          g_assert_true ((strchr (port->key, '#') != NULL) == (port->repeat != NULL));
          g_assert_true (port->repeat == NULL || hl_kind_find_option (kind, port->repeat) >= 0);
          g_assert_cmpuint (strlen (port->name), >, 0);
        }
    }
}

/* Every quantity named port.x belongs to a port of the kind and has the dimension of x. */
static void
test_port_quantities_fit_their_ports (void)
{
  for (guint k = 0; k < hl_kind_count (); k++)
    {
      const HlKind *kind = hl_kind_nth (k);
      for (guint i = 0; i < kind->n_quantities; i++)
        {
          const char *dot = strchr (kind->quantities[i].key, '.');
          const HlQuantityKind *state = dot != NULL ? hl_stream_quantity_lookup (dot + 1) : NULL;
          gboolean found = FALSE;
          if (dot == NULL)
            continue;
          g_assert_nonnull (state);
          g_assert_cmpint (state->dimension, ==, kind->quantities[i].dimension);
          for (guint j = 0; j < kind->n_ports; j++)
            found = found || (strlen (kind->ports[j].key) == (gsize) (dot - kind->quantities[i].key)
                              && strncmp (kind->ports[j].key, kind->quantities[i].key, strlen (kind->ports[j].key)) == 0);
          g_assert_true (found);
        }
    }
}

static void
test_numbered_defaults (void)
{
  static const double expected[] = { 6e5, 2.5e5, 1.25e5, 0.625e5 };
  g_autoptr (HlComponent) turbine = hl_component_new (hl_kind_lookup ("turbine"), "T1", 0, 0);
  hl_component_set_option (turbine, "extractions", 4);
  for (int i = 0; i < 4; i++)
    {
      g_autofree char *key = g_strdup_printf ("extraction%d.p", i + 1);
      g_assert_cmpfloat (hl_values_find (&turbine->values, key)->value, ==, expected[i]);
    }
  g_assert_cmpfloat (hl_quantity_default (hl_plant_quantity_lookup ("net_power"), 0), ==, 10e6);
  g_assert_true (isnan (hl_quantity_default (hl_plant_quantity_lookup ("heat_rate"), 0)));
}

/* The rule of kind.h: marked ratios in percent, the others as plain numbers. */
static void
test_percent_rule (void)
{
  const HlQuantityKind *efficiency = hl_plant_quantity_lookup ("net_efficiency_lhv"), *quality = hl_stream_quantity_lookup ("x");
  g_autofree char *percent = hl_quantity_format (efficiency, 0.38214, HL_UNITS_METRIC);
  g_autofree char *zero = hl_quantity_format (efficiency, -1e-9, HL_UNITS_METRIC);
  g_autofree char *none = hl_quantity_format (efficiency, NAN, HL_UNITS_METRIC);
  g_autofree char *plain = hl_quantity_format (quality, 0.901, HL_UNITS_METRIC);
  g_autofree char *exact = hl_quantity_format_exact (efficiency, 0.025, HL_UNITS_METRIC);
  g_autofree char *exact_plain = hl_quantity_format_exact (quality, 0.025, HL_UNITS_METRIC);
  g_assert_cmpstr (percent, ==, "38.21 %");
  g_assert_cmpstr (zero, ==, "0.00 %");
  g_assert_cmpstr (none, ==, "–");
  g_assert_cmpstr (plain, ==, "0.901");
  g_assert_cmpstr (exact, ==, "2.5 %");
  g_assert_cmpstr (exact_plain, ==, "0.025");
}

int
main (int argc, char **argv)
{
  g_test_init (&argc, &argv, NULL);
  g_test_add_func ("/kinds/rows-are-complete", test_rows_are_complete);
  g_test_add_func ("/kinds/ports-and-options-are-complete", test_ports_and_options_are_complete);
  g_test_add_func ("/kinds/port-quantities-fit-their-ports", test_port_quantities_fit_their_ports);
  g_test_add_func ("/kinds/numbered-defaults", test_numbered_defaults);
  g_test_add_func ("/kinds/percent-rule", test_percent_rule);
  return g_test_run ();
}
