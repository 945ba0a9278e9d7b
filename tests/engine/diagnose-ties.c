/* Ties in plants: solved, followed to the note, and named where they cannot hold.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "plants.h"
#include <math.h>

static HlPlant *
tie (HlPlant *plant, const char *address, const char *text)
{
  HlAddress at;
  HlValue value;
  g_autoptr (GError) error = NULL;
  hl_address_parse (address, plant, &at, &error);
  g_assert_no_error (error);
  hl_value_parse (plant, &at, text, &value, &error);
  g_assert_no_error (error);
  HlPlant *tied = hl_plant_with_value (plant, &at, &value, &error);
  g_assert_no_error (error);
  hl_plant_unref (plant);
  return tied;
}

static HlSolution *
solve (HlPlant *plant)
{
  HlSolution *s = hl_solve (plant, NULL);
  hl_plant_unref (plant);
  return s;
}

/* Ties of several quantities hold in the solution; each row gives what it must be, from other results. */
static void
test_ties_hold (void)
{
  g_autoptr (HlSolution) mean = solve (tie (test_plant (test_reheat_plant), "T2.extraction1.p", "=sqrt(T2.inlet.p*T2.exhaust.p)"));
  test_assert_solved (mean);
  test_assert_near (test_value (mean, "T2.extraction1.p"), sqrt (test_value (mean, "T2.inlet.p") * 6000.0), 1e-10);

  g_autoptr (HlSolution) half = solve (tie (test_plant (test_reheat_plant), "T2.extraction1.p", "=(T1.exhaust.p - 22 bar)/2"));
  test_assert_solved (half);
  test_assert_near (test_value (half, "T2.extraction1.p"), 6e5, 1e-12);

  g_autoptr (HlSolution) most = solve (tie (test_plant (test_reheat_plant), "T2.extraction1.p", "=max(T2.exhaust.p; 0.05*T1.exhaust.p; 5 bar)"));
  test_assert_solved (most);
  test_assert_near (test_value (most, "T2.extraction1.p"), 5e5, 1e-12);

  /* What ties the flow of the plant to its heats: the net power follows. */
  g_autoptr (HlSolution) power = solve (tie (test_plant (test_simple_loop), "plant.net_power", "=0.25*(Q1.heat + C1.heat) - 5 MW"));
  test_assert_solved (power);
  test_assert_near (test_value (power, "plant.net_power"), 0.25 * (test_value (power, "Q1.heat") + test_value (power, "C1.heat")) - 5e6, 1e-9);

  /* Two quantities that are one and the same in this plant. */
  g_autoptr (HlSolution) twice = solve (tie (test_plant (test_simple_loop), "T1.exhaust.p", "=0.001*(T1.inlet.p + Q1.steam.p)/2"));
  test_assert_solved (twice);
  test_assert_near (test_value (twice, "T1.exhaust.p"), 6500.0, 1e-12);
}

static void
test_temperatures (void)
{
  g_autoptr (HlSolution) s = solve (tie (test_plant (test_reheat_plant), "B1.hot_reheat1.T", "=B1.steam.T - 10 K"));
  test_assert_solved (s);
  test_assert_near (test_value (s, "B1.hot_reheat1.T"), 803.15, 1e-12);
  g_autoptr (HlSolution) rise = solve (tie (test_plant (test_simple_loop), "C1.cooling_rise", "=(C1.steam.T - 15 K - C1.cooling_inlet_T)/1"));
  test_assert_solved (rise);
  test_assert_near (test_value (rise, "C1.cooling_rise"), test_value (rise, "C1.steam.T") - 15.0 - 288.15, 1e-9);
}

static void
test_broken_ties (void)
{
  const char *pump[] = { "P1", NULL };
  g_autoptr (HlPlant) plant = tie (test_plant (test_reheat_plant), "T2.extraction1.p", "=0.5*P1.outlet.p + 0.001*T1.inlet.p");
  g_autoptr (HlPlant) without = hl_plant_without (plant, pump);
  g_autoptr (HlSolution) s = hl_solve (without, NULL);
  const HlFinding *finding = test_finding (s, "tie-broken");
  g_assert_nonnull (finding);
  g_assert_cmpstr (finding->text, ==,
    "extraction pressure 1 of T2 is tied to P1.outlet.p, but there is no component P1 any more. Tie it to another quantity, give it a number, or let it be found.");
  g_assert_cmpint (finding->grade, ==, HL_GRADE_ERROR);
  g_assert_cmpstr (finding->mends[0].text, ==, "Change extraction pressure 1 of T2");
  g_assert_cmpstr (finding->mends[1].text, ==, "Let extraction pressure 1 of T2 be found");
  g_autoptr (HlPlant) mended = hl_mend_apply (&finding->mends[1], without, NULL);
  g_autoptr (HlSolution) after = hl_solve (mended, NULL);
  g_assert_null (test_finding (after, "tie-broken"));
  /* It is filed and read as it stands, and holds again when what it names is back. */
  g_autofree char *json = hl_plant_to_json (without);
  g_autoptr (HlPlant) read = hl_plant_from_json (json, -1, "plant", NULL);
  g_assert_true (hl_plant_equal (read, without));

  g_autoptr (HlSolution) nothing = solve (tie (test_plant (test_simple_loop), "T1.exhaust.p", "=plant.fuel_flow/plant.fuel_flow*T1.inlet.p/1000"));
  finding = test_finding (nothing, "tie-broken");
  g_assert_nonnull (finding);
  g_assert_cmpstr (finding->text, ==,
    "exhaust pressure of T1 is tied to plant.fuel_flow, which nothing in this plant makes. Tie it to another quantity, give it a number, or let it be found.");
}

static void
test_circles (void)
{
  HlPlant *two = tie (tie (test_plant (test_reheat_plant), "T2.extraction1.p", "=0.2*T1.extraction1.p"), "T1.extraction1.p", "=4*T2.extraction1.p + 10 bar");
  g_autoptr (HlSolution) s = solve (two);
  const HlFinding *finding = test_finding (s, "tie-circle");
  g_assert_nonnull (finding);
  g_assert_cmpstr (finding->text, ==,
    "Ties run in a circle: T1.extraction1.p = 4*T2.extraction1.p + 10 bar, T2.extraction1.p = 0.2*T1.extraction1.p. "
    "None of them can be worked out before the others. Give one of them a number, or let it be found.");
  g_assert_cmpuint (finding->n_mends, ==, 2);
  g_assert_cmpstr (finding->mends[0].text, ==, "Change extraction pressure 1 of T1");
  g_assert_false (hl_solution_is_solved (s));

  /* Through three, one of which names more than it needs to. */
  HlPlant *three = tie (tie (tie (test_plant (test_reheat_plant), "T2.extraction1.p", "=0.2*T1.extraction1.p + T2.exhaust.p"), "T1.extraction1.p", "=T1.exhaust.p + 1 bar"),
                        "T1.exhaust.p", "=T2.extraction1.p*5");
  g_autoptr (HlSolution) t = solve (three);
  finding = test_finding (t, "tie-circle");
  g_assert_nonnull (finding);
  g_assert_cmpuint (finding->n_mends, ==, 3);

  /* Nothing changes the flow between these two. */
  g_autoptr (HlSolution) same = solve (tie (test_plant (test_simple_loop), "T1.inlet.m", "=0.5*P1.outlet.m + 1 kg/s"));
  finding = test_finding (same, "tie-circle");
  g_assert_nonnull (finding);
  g_assert_cmpstr (finding->text, ==,
    "A tie leads back to itself: T1.inlet.m = 0.5*P1.outlet.m + 1 kg/s; both are the same number in this plant. Give it a number, or tie it to something else.");
}

int
main (int argc, char **argv)
{
  g_test_init (&argc, &argv, NULL);
  g_test_add_func ("/engine/diagnose-ties/ties-hold", test_ties_hold);
  g_test_add_func ("/engine/diagnose-ties/temperatures", test_temperatures);
  g_test_add_func ("/engine/diagnose-ties/broken", test_broken_ties);
  g_test_add_func ("/engine/diagnose-ties/circles", test_circles);
  return g_test_run ();
}
