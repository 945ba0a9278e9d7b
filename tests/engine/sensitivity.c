/* Derivatives of results with respect to given values, against differences of whole solutions.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "plants.h"
#include <math.h>
#include <string.h>

static HlAddress
address (const HlSolution *s, const char *text)
{
  HlAddress found;
  g_autoptr (GError) error = NULL;
  if (!hl_address_parse (text, hl_solution_plant (s), &found, &error))
    g_error ("%s", error->message);
  return found;
}

/* The result with a given value moved. */
static double
moved (const HlSolution *s, const HlAddress *result, const HlSensitivity *given, double value)
{
  const HlValue *old = hl_plant_value (hl_solution_plant (s), &given->given);
  HlValue now = { .origin = old->origin, .value = value };
  g_autoptr (GError) error = NULL;
  g_autoptr (HlPlant) plant = hl_plant_with_value (hl_solution_plant (s), &given->given, &now, &error);
  g_assert_no_error (error);
  g_autoptr (HlSolution) t = hl_solve (plant, s);
  double found;
  test_assert_solved (t);
  g_assert_true (hl_solution_value (t, result, &found));
  return found;
}

/* Central differences of a part of the value: of a ten-thousandth the solver's last digits count 1e-7 of the result, the curvature
 * less.  @scale: what the result is a difference of, where its last digits are those of larger numbers; 0: its own. */
static guint
compare_by (const char *text, const char *result_text, double part, double scale)
{
  guint n = 0;
  g_autoptr (HlPlant) plant = test_plant (text);
  g_autoptr (HlSolution) s = hl_solve (plant, NULL);
  HlAddress result = address (s, result_text);
  g_autoptr (GArray) list = hl_solution_sensitivities (s, &result);
  double value;
  g_assert_nonnull (list);
  g_assert_true (hl_solution_value (s, &result, &value));
  for (guint k = 0; k < list->len; k++)
    {
      const HlSensitivity *one = &g_array_index (list, HlSensitivity, k);
      double step = part * fabs (one->value), alone;
      g_assert_true (hl_solution_sensitivity (s, &result, &one->given, &alone));
      g_assert_cmpfloat (alone, ==, one->derivative);
      if (!(step > 0.0))
        continue;               /* zero is an end of the range: no two-sided difference */
      double difference = (moved (s, &result, one, one->value + step) - moved (s, &result, one, one->value - step)) / (2.0 * step);
      double tolerance = 1e-5 * fabs (difference) + 1e-6 * fmax (fabs (value), scale) / fabs (one->value);
      if (!(fabs (difference - one->derivative) <= tolerance))
        {
          g_autofree char *name = hl_address_to_text (&one->given);
          g_error ("d %s / d %s is %.9g, by differences %.9g", result_text, name, one->derivative, difference);
        }
      n++;
    }
  return n;
}

static guint
compare (const char *text, const char *result)
{
  return compare_by (text, result, 1e-4, 0.0);
}

/* What is destroyed is a small difference of flows of entropy times the dead state's temperature, each as large as the heat; property
 * calls whose derivatives hold to 1e-6 leave that much of the heat. */
static guint
compare_exergy (const char *text, const char *result)
{
  g_autoptr (HlPlant) plant = test_plant (text);
  g_autoptr (HlSolution) s = hl_solve (plant, NULL);
  if (strstr (result, "stream:") != NULL)
    return compare (text, result);
  /* An efficiency is a quotient of two such. */
  return compare_by (text, result, 5e-4, strstr (result, "exergy_efficiency") != NULL ? 2.0 : test_value (s, "plant.heat_input"));
}

static void
test_against_differences (void)
{
  g_assert_cmpuint (compare (test_simple_loop, "T1.inlet.m") + compare (test_simple_loop, "plant.net_efficiency_lhv"), >, 16);
  g_assert_cmpuint (compare (test_simple_loop, "plant.carnot_efficiency") + compare (test_simple_loop, "plant.exhaust_moisture"), >, 16);
  g_assert_cmpuint (compare (test_reheat_plant, "plant.heat_rate") + compare (test_reheat_plant, "H1.UA"), >, 30);
  g_assert_cmpuint (compare (test_large_plant, "plant.net_efficiency_hhv"), >, 40);
  g_assert_cmpuint (compare (test_industrial_plant, "plant.net_power") + compare (test_industrial_plant, "B1.fuel_flow"), >, 30);
}

static void
test_states_of_streams (void)
{
  const char *const results[] = { "stream:2.h", "stream:2.s", "stream:2.v", "stream:2.x", "stream:4.T", "stream:1.m", "stream:3.p" };
  for (guint k = 0; k < G_N_ELEMENTS (results); k++)
    g_assert_cmpuint (compare (test_simple_loop, results[k]), >, 8);
}

/* Second law: streams, components of every sort, and the plant. */
static void
test_exergy (void)
{
  const char *const loop[] = { "stream:2.e", "T1.exergy_destruction", "T1.exergy_efficiency", "C1.exergy_destruction", "C1.exergy_fuel", "plant.exergy_efficiency",
                               "plant.exergy_destruction" };
  const char *const industrial[] = { "B1.exergy_efficiency", "D1.exergy_efficiency", "U1.exergy_product", "U1.exergy_loss", "P1.exergy_product", "plant.exergy_input",
                                     "plant.exergy_efficiency", "plant.exergy_loss" };
  for (guint k = 0; k < G_N_ELEMENTS (loop); k++)
    g_assert_cmpuint (compare_exergy (test_simple_loop, loop[k]), >, 5);
  for (guint k = 0; k < G_N_ELEMENTS (industrial); k++)
    g_assert_cmpuint (compare_exergy (test_industrial_plant, industrial[k]), >, 15);
  g_assert_cmpuint (compare_exergy (test_reheat_plant, "H1.exergy_efficiency") + compare_exergy (test_reheat_plant, "plant.exergy_efficiency"), >, 30);
}

/* By hand: the shaft power is the internal power times the mechanical efficiency, the internal power follows from net power
 * and efficiencies alone; so d T1.power / d net_power at a pump that costs little is just over 1 / generator efficiency. */
static void
test_by_hand (void)
{
  g_autoptr (HlPlant) plant = test_plant (test_simple_loop);
  g_autoptr (HlSolution) s = hl_solve (plant, NULL);
  HlAddress flow = address (s, "T1.inlet.m"), net = address (s, "plant.net_power"), power = address (s, "T1.power");
  double to_flow, to_power;
  g_assert_true (hl_solution_sensitivity (s, &flow, &net, &to_flow));
  g_assert_true (hl_solution_sensitivity (s, &power, &net, &to_power));
  test_assert_near (to_flow, test_value (s, "T1.inlet.m") / 12e6, 1e-10);      /* all is in proportion to the net power */
  test_assert_near (to_power, test_value (s, "T1.power") / 12e6, 1e-10);
}

static void
test_what_has_none (void)
{
  g_autoptr (HlPlant) plant = test_plant (test_simple_loop);
  g_autoptr (HlSolution) s = hl_solve (plant, NULL);
  HlAddress flow = address (s, "T1.inlet.m"), found = address (s, "T1.power");
  double value;
  g_assert_false (hl_solution_sensitivity (s, &flow, &found, &value));         /* found, not put in */
  g_autoptr (HlPlant) open = test_plant_let_go (test_plant (test_simple_loop), "T1.exhaust.p");
  g_autoptr (HlSolution) t = hl_solve (open, NULL);
  g_assert_null (hl_solution_sensitivities (t, &flow));                        /* not solved */
}

int
main (int argc, char **argv)
{
  g_test_init (&argc, &argv, NULL);
  g_test_add_func ("/engine/sensitivity/differences", test_against_differences);
  g_test_add_func ("/engine/sensitivity/states", test_states_of_streams);
  g_test_add_func ("/engine/sensitivity/exergy", test_exergy);
  g_test_add_func ("/engine/sensitivity/by-hand", test_by_hand);
  g_test_add_func ("/engine/sensitivity/none", test_what_has_none);
  return g_test_run ();
}
