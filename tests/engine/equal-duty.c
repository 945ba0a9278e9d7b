/* Plants at equal duty: what the reference gives is given to the other, and what cannot be is told.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "engine/equal-duty.h"
#include "plants.h"

static const HlDuty *
duty (const GArray *duties, const char *text)
{
  for (guint i = 0; i < duties->len; i++)
    {
      const HlDuty *found = &g_array_index (duties, HlDuty, i);
      g_autofree char *address = hl_address_to_text (&found->address);
      if (g_str_equal (address, text))
        return found;
    }
  return NULL;
}

static void
test_net_power_of_the_reference_is_held (void)
{
  g_autoptr (HlPlant) plant = test_plant_set (test_plant (test_simple_loop), "plant.net_power", 12e6);
  g_autoptr (HlPlant) other = test_plant_set (test_plant_set (test_plant (test_simple_loop), "plant.net_power", 5e6), "T1.isentropic_efficiency", 0.7);
  g_autoptr (HlSolution) reference = hl_solve (plant, NULL), own = hl_solve (other, NULL), equal = NULL;
  g_autoptr (GArray) duties = NULL;
  test_assert_solved (reference);
  test_assert_solved (own);
  equal = hl_solve_at_duty (own, reference, &duties);
  test_assert_solved (equal);
  test_assert_near (test_value (equal, "plant.net_power"), 12e6, 1e-9);
  test_assert_near (test_value (equal, "T1.isentropic_efficiency"), 0.7, 1e-12);
  test_assert_near (test_value (own, "plant.net_power"), 5e6, 1e-9);
  g_assert_true (duty (duties, "plant.net_power")->is_held);
  /* Flows follow the power, intensive results do not. */
  test_assert_near (test_value (equal, "Q1.steam.m") / test_value (own, "Q1.steam.m"), 12.0 / 5.0, 1e-8);
  test_assert_near (test_value (equal, "plant.cycle_efficiency"), test_value (own, "plant.cycle_efficiency"), 1e-8);
}

static void
test_the_same_duty_needs_no_second_solution (void)
{
  g_autoptr (HlPlant) plant = test_plant_set (test_plant (test_simple_loop), "plant.net_power", 12e6);
  g_autoptr (HlPlant) other = test_plant_set (hl_plant_ref (plant), "T1.isentropic_efficiency", 0.7);
  g_autoptr (HlSolution) reference = hl_solve (plant, NULL), own = hl_solve (other, NULL);
  g_autoptr (HlSolution) equal = hl_solve_at_duty (own, reference, NULL);
  g_assert_true (equal == own);
}

/* The other gives its flow, so the power would be one too many, and no assumed value can make room. */
static void
test_a_duty_that_cannot_be_held_is_told (void)
{
  g_autoptr (HlPlant) plant = test_plant_set (test_plant (test_simple_loop), "plant.net_power", 12e6);
  g_autoptr (HlPlant) other = test_plant_let_go (test_plant (test_simple_loop), "plant.net_power");
  other = test_plant_set (g_steal_pointer (&other), "Q1.steam.m", 10.0);
  g_autoptr (HlSolution) reference = hl_solve (plant, NULL), own = hl_solve (other, NULL), equal = NULL;
  g_autoptr (GArray) duties = NULL;
  test_assert_solved (own);
  equal = hl_solve_at_duty (own, reference, &duties);
  g_assert_true (equal == own);
  g_assert_false (duty (duties, "plant.net_power")->is_held);
  g_assert_cmpstr (duty (duties, "plant.net_power")->why_not, !=, "");
  g_assert_null (duty (duties, "plant.net_power")->yielded);
}

/* Where a value is only assumed, it makes room, and is named. */
static void
test_an_assumed_value_makes_room (void)
{
  g_autoptr (HlPlant) plant = test_plant_set (test_plant (test_simple_loop), "plant.net_power", 12e6);
  g_autoptr (HlPlant) other = test_plant_let_go (test_plant (test_simple_loop), "plant.net_power"), assuming = NULL;
  HlAddress flow = hl_address_component ("Q1", "steam.m");
  HlValue value = { .origin = HL_ORIGIN_ASSUMED, .value = 10.0 };
  assuming = hl_plant_with_value (other, &flow, &value, NULL);
  g_autoptr (HlSolution) reference = hl_solve (plant, NULL), own = hl_solve (assuming, NULL), equal = NULL;
  g_autoptr (GArray) duties = NULL;
  equal = hl_solve_at_duty (own, reference, &duties);
  test_assert_solved (equal);
  test_assert_near (test_value (equal, "plant.net_power"), 12e6, 1e-9);
  test_assert_near (test_value (equal, "Q1.steam.m"), test_value (reference, "Q1.steam.m"), 1e-8);
  g_assert_cmpstr (duty (duties, "plant.net_power")->yielded, ==, "mass flow at steam outlet of Q1 is now found");
}

static void
test_a_duty_that_is_not_there_is_told (void)
{
  g_autoptr (HlPlant) plant = test_plant (test_industrial_plant);
  g_autoptr (HlPlant) other = test_plant_set (test_plant (test_simple_loop), "plant.net_power", 5e6);
  g_autoptr (HlSolution) reference = hl_solve (plant, NULL), own = hl_solve (other, NULL), equal = NULL;
  g_autoptr (GArray) duties = NULL;
  guint n_missing = 0;
  equal = hl_solve_at_duty (own, reference, &duties);
  for (guint i = 0; i < duties->len; i++)
    n_missing += g_strcmp0 (g_array_index (duties, HlDuty, i).why_not, "there is no such quantity here") == 0;
  g_assert_cmpuint (n_missing, >, 0);
  g_assert_nonnull (equal);
}

int
main (int argc, char **argv)
{
  g_test_init (&argc, &argv, NULL);
  g_test_add_func ("/equal-duty/net-power-of-the-reference-is-held", test_net_power_of_the_reference_is_held);
  g_test_add_func ("/equal-duty/the-same-duty-needs-no-second-solution", test_the_same_duty_needs_no_second_solution);
  g_test_add_func ("/equal-duty/a-duty-that-cannot-be-held-is-told", test_a_duty_that_cannot_be_held_is_told);
  g_test_add_func ("/equal-duty/an-assumed-value-makes-room", test_an_assumed_value_makes_room);
  g_test_add_func ("/equal-duty/a-duty-that-is-not-there-is-told", test_a_duty_that_is_not_there_is_told);
  return g_test_run ();
}
