/* Design and rating: flow constants against a hand calculation; sizes swapped for what they find leave the demo plants as they are.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "laws.h"
#include <math.h>
#include <string.h>

#define EXPAND(words) \
  "boundary Y1 direction:0 outlet.T=750\nboundary Y2 direction:1\nboundary Y3 direction:1 inlet.p=8000\n" \
  "turbine T1 extractions:1 isentropic_efficiency=0.85 mechanical_efficiency=0.98 " words "\nY1.outlet > T1.inlet\nT1.extraction1 > Y2.inlet\nT1.exhaust > Y3.inlet\n"
#define DESIGN EXPAND ("inlet.p=60e5 inlet.m=20 extraction1.p=6e5 extraction1.m=4")

static void
test_flow_constants_by_hand (void)
{
  g_autoptr (HlPlant) plant = test_plant (DESIGN);
  g_autoptr (HlSolution) s = hl_solve (plant, NULL);
  test_assert_solved (s);
  test_assert_near (test_value (s, "T1.flow_constant1"), 20.0 / sqrt (60e5 / test_value (s, "T1.inlet.v") * (1.0 - 0.01)), 1e-9);
  double r = 8000.0 / 6e5;
  test_assert_near (test_value (s, "T1.flow_constant2"), 16.0 / sqrt (6e5 / test_value (s, "T1.extraction1.v") * (1.0 - r * r)), 1e-9);
}

/* With little pressure behind a group its inlet pressure goes with the flow, nearly: the ellipse with r near 0. */
static void
test_less_flow_less_pressure (void)
{
  g_autoptr (HlPlant) plant = test_plant (DESIGN);
  g_autoptr (HlSolution) s = hl_solve (plant, NULL);
  g_autofree char *words = g_strdup_printf (EXPAND ("inlet.m=10 extraction1.m=2 flow_constant1=%.17g flow_constant2=%.17g"),
                                            test_value (s, "T1.flow_constant1"), test_value (s, "T1.flow_constant2"));
  g_autoptr (HlPlant) half = test_plant (words);
  g_autoptr (HlSolution) t = hl_solve (half, s);
  test_assert_solved (t);
  g_assert_cmpfloat_with_epsilon (test_value (t, "T1.inlet.p") / 60e5, 0.5, 0.01);
  g_assert_cmpfloat_with_epsilon (test_value (t, "T1.extraction1.p") / 6e5, 0.5, 0.03);
}

static void
test_derivatives (void)
{
  test_check_derivatives (DESIGN);
}

static HlPlant *
load_demo (const char *name)
{
  g_autofree char *path = g_test_build_filename (G_TEST_DIST, "..", "data", "examples", name, NULL);
  g_autoptr (GError) error = NULL;
  HlPlant *plant = hl_plant_load (path, &error);
  g_assert_no_error (error);
  return plant;
}

/* Freezes every size of which the plant states what it would find.  How many. */
static guint
freeze (HlPlant **plant, const HlSolution *design, GPtrArray *found)
{
  guint n = 0;
  for (guint c = 0; c < hl_plant_n_components (hl_solution_plant (design)); c++)
    {
      const HlComponent *component = hl_plant_component (hl_solution_plant (design), c);
      for (guint k = 0; k < hl_component_n_ratings (component); k++)
        {
          HlRatingPair pair = hl_component_rating (component, k);
          HlAddress frozen = hl_address_component (component->id, pair.frozen), free = hl_address_component (component->id, pair.found), where;
          double size;
          if (hl_plant_value_wherever (*plant, &free, &where) == NULL || !hl_solution_value (design, &frozen, &size))
            continue;
          g_autofree char *frozen_text = hl_address_to_text (&frozen), *free_text = hl_address_to_text (&where);
          *plant = test_plant_set (test_plant_let_go (*plant, free_text), frozen_text, size);
          g_ptr_array_add (found, g_steal_pointer (&free_text));
          n++;
        }
    }
  return n;
}

static void
test_demos_stay_as_they_are (void)
{
  static const struct { const char *name; guint least; } demos[] = {
    { "ferry-lane.heatloom", 1 }, { "linden-row.heatloom", 3 }, { "tallow-fen.heatloom", 3 }, { "vesper-point.heatloom", 12 }, { "marrow-quay.heatloom", 2 } };
  for (guint k = 0; k < G_N_ELEMENTS (demos); k++)
    {
      HlPlant *plant = load_demo (demos[k].name);
      g_autoptr (HlSolution) design = hl_solve (plant, NULL);
      g_autoptr (GPtrArray) found = g_ptr_array_new_with_free_func (g_free);
      test_assert_solved (design);
      guint n = freeze (&plant, design, found);
      g_test_message ("%s: %u sizes frozen", demos[k].name, n);
      g_assert_cmpuint (n, >=, demos[k].least);
      g_autoptr (HlSolution) rated = hl_solve (plant, design);
      hl_plant_unref (plant);
      test_assert_solved (rated);
      for (guint i = 0; i < found->len; i++)
        {
          const char *address = g_ptr_array_index (found, i);
          double was = test_value (design, address), is = test_value (rated, address);
          if (!(fabs (is - was) <= 1e-5 * (fabs (was) + 1.0)))
            g_error ("%s: %s is %.10g, was %.10g in design", demos[k].name, address, is, was);
        }
    }
}

/* What a table freezes and finds, it lists, with every option that the kind has. */
static void
test_declarations_are_quantities (void)
{
  guint n = 0;
  for (guint k = 0; k < hl_kind_count (); k++)
    {
      HlComponent *component = hl_component_new (hl_kind_nth (k), g_intern_static_string ("Z1"), 0, 0);
      for (guint o = 0; o < component->kind->n_options; o++)
        if (component->kind->options[o].choices == NULL)
          hl_component_set_option (component, component->kind->options[o].key, component->kind->options[o].most);
      for (guint i = 0; i < hl_component_n_ratings (component); i++, n++)
        {
          HlRatingPair pair = hl_component_rating (component, i);
          gboolean has_frozen = FALSE, has_found = FALSE;
          for (guint q = 0; q < hl_component_n_quantities (component); q++)
            {
              has_frozen |= hl_component_quantity (component, q).key == pair.frozen;
              has_found |= hl_component_quantity (component, q).key == pair.found;
            }
          if (!has_frozen || !has_found)
            g_error ("%s freezes %s and finds %s, which it does not list", component->kind->id, pair.frozen, pair.found);
        }
      hl_component_unref (component);
    }
  g_assert_cmpuint (n, >, 15);
}

/* A pressure typed as 65 bar is 6500000 Pa, and a temperature what was typed, to the last digit. */
static void
test_given_values_read_back (void)
{
  g_autoptr (HlPlant) plant = load_demo ("tallow-fen.heatloom");
  g_autoptr (HlSolution) s = hl_solve (plant, NULL);
  static const struct { const char *address; double value; } given[] = {
    { "B1.steam.p", 65e5 }, { "B1.steam.T", 758.15 }, { "T1.exhaust.p", 7000.0 }, { "D1.steam.p", 2.5e5 }, { "T1.extraction1.p", 12e5 }, { "W1.outlet.T", 288.15 } };
  for (guint k = 0; k < G_N_ELEMENTS (given); k++)
    g_assert_cmpfloat (test_value (s, given[k].address), ==, given[k].value);
  HlStreamResult live;
  hl_solution_stream (s, 0, &live);
  g_assert_cmpfloat (live.state.p, ==, 65e5);
  g_assert_cmpfloat (live.state.T, ==, 758.15);
}

int
main (int argc, char **argv)
{
  g_test_init (&argc, &argv, NULL);
  g_test_add_func ("/engine/rating/flow-constants-by-hand", test_flow_constants_by_hand);
  g_test_add_func ("/engine/rating/less-flow-less-pressure", test_less_flow_less_pressure);
  g_test_add_func ("/engine/rating/derivatives", test_derivatives);
  g_test_add_func ("/engine/rating/demos-stay-as-they-are", test_demos_stay_as_they_are);
  g_test_add_func ("/engine/rating/declarations-are-quantities", test_declarations_are_quantities);
  g_test_add_func ("/engine/rating/given-values-read-back", test_given_values_read_back);
  return g_test_run ();
}
