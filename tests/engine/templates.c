/* Templates: each solves as it stands, with nothing that would have to be said about it, and with nothing but assumed values.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "laws.h"
#include "plant/template.h"

static guint
n_heaters (HlPlant *plant)
{
  guint count = 0;
  for (guint n = 0; n < hl_plant_n_components (plant); n++)
    {
      const char *kind = hl_plant_component (plant, n)->kind->id;
      count += g_str_equal (kind, "closed_heater") || g_str_equal (kind, "open_heater");
    }
  return count;
}

static void
assert_only_assumed (const HlValues *values)
{
  for (guint n = 0; n < values->n; n++)
    g_assert_cmpint (values->entries[n].value.origin, ==, HL_ORIGIN_ASSUMED);
}

static void
check (const HlTemplate *template, int heaters)
{
  g_autoptr (HlPlant) plant = hl_template_build (template, heaters);
  g_autoptr (HlSolution) solution = hl_solve (plant, NULL);
  g_autofree char *text = hl_plant_to_json (plant);
  g_autoptr (GError) error = NULL;
  g_autoptr (HlPlant) again = hl_plant_from_json (text, -1, template->id, &error);

  g_assert_no_error (error);
  g_assert_true (hl_plant_equal (plant, again));
  g_assert_true (hl_solution_is_solved (solution));
  for (guint n = 0; n < hl_solution_n_findings (solution); n++)
    if (hl_solution_finding (solution, n)->grade > HL_GRADE_HINT)
      g_error ("%s with %d heaters: %s", template->id, heaters, hl_solution_finding (solution, n)->text);
  test_assert_balanced (solution);
  if (template->most > 0)
    g_assert_cmpuint (n_heaters (plant), ==, (guint) heaters);
  for (guint n = 0; n < hl_plant_n_components (plant); n++)
    assert_only_assumed (&hl_plant_component (plant, n)->values);
  assert_only_assumed (hl_plant_values (plant));
}

static void
test_every_template_solves (void)
{
  g_assert_cmpuint (hl_template_count (), >=, 5);
  for (guint n = 0; n < hl_template_count (); n++)
    {
      const HlTemplate *template = hl_template_nth (n);
      g_assert_true (hl_template_lookup (template->id) == template);
      for (int heaters = template->least; heaters <= template->most; heaters++)
        check (template, heaters);
    }
  g_assert_null (hl_template_lookup ("no such template"));
  g_assert_null (hl_template_nth (hl_template_count ()));
}

/* More heaters, better efficiency, with smaller and smaller gains: what regeneration is for (common practice, no source). */
static void
test_heaters_pay (void)
{
  const HlTemplate *template = hl_template_lookup ("regenerative");
  HlAddress address = hl_address_plant ("cycle_efficiency");
  double former = 0.0, former_gain = 1.0;
  for (int heaters = 1; heaters <= 4; heaters++)
    {
      g_autoptr (HlPlant) plant = hl_template_build (template, heaters);
      g_autoptr (HlSolution) solution = hl_solve (plant, NULL);
      double efficiency;
      g_assert_true (hl_solution_value (solution, &address, &efficiency));
      g_assert_cmpfloat (efficiency, >, former);
      if (heaters > 1)
        {
          g_assert_cmpfloat (efficiency - former, <, former_gain);
          former_gain = efficiency - former;
        }
      former = efficiency;
    }
}

int
main (int argc, char **argv)
{
  g_test_init (&argc, &argv, NULL);
  g_test_add_func ("/engine/templates/solve", test_every_template_solves);
  g_test_add_func ("/engine/templates/heaters", test_heaters_pay);
  return g_test_run ();
}
