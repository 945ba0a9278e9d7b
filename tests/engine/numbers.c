/* Numbers: single unknowns from bad starts, blocks small and large, singular ones named, failures reported.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "plants.h"
#include "engine/equations.h"
#include "engine/numbers.h"
#include <math.h>

static const HlAddress none = { HL_OWNER_PLANT, "", "" };

typedef struct { HlSystem *system; HlStructure *structure; HlNumbers numbers; } Solved;

static void
run (Solved *s)
{
  hl_system_close (s->system);
  s->structure = hl_structure_new (s->system);
  hl_numbers_solve (s->system, s->structure, NULL, &s->numbers);
}

static void
finish (Solved *s)
{
  g_free (s->numbers.is_known);
  hl_structure_free (s->structure);
  hl_system_free (s->system);
}

/* Pressure from a saturation temperature, from starts all over the range. */
static void
test_one_unknown_from_any_start (void)
{
  for (double start = 1e3; start < 9e7; start *= 3.0)
    {
      Solved s = { hl_system_new (), NULL, { 0 } };
      int p = hl_system_add_var (s.system, HL_VAR_PRESSURE, none, log (start)), T = hl_system_add_var (s.system, HL_VAR_TEMPERATURE, none, NAN);
      hl_add_saturation (s.system, hl_fluid_water (), p, T);
      hl_system_add_spec (s.system, T, none, HL_ORIGIN_GIVEN, 453.0);
      run (&s);
      HlSaturation sat;
      g_assert_cmpint (hl_fluid_saturation_T (hl_fluid_water (), 453.0, &sat), ==, HL_OK);
      g_assert_cmpint (s.numbers.failed, ==, HL_FAILED_NOT);
      test_assert_near (hl_system_value (s.system, p), sat.p, 1e-10);
      finish (&s);
    }
}

/* No pressure has this saturation temperature: the failure says so and names the equation. */
static void
test_one_unknown_without_answer (void)
{
  Solved s = { hl_system_new (), NULL, { 0 } };
  int p = hl_system_add_var (s.system, HL_VAR_PRESSURE, none, NAN), T = hl_system_add_var (s.system, HL_VAR_TEMPERATURE, none, NAN);
  hl_add_saturation (s.system, hl_fluid_water (), p, T);
  hl_system_add_spec (s.system, T, none, HL_ORIGIN_GIVEN, 700.0);
  run (&s);
  g_assert_cmpint (s.numbers.failed, !=, HL_FAILED_NOT);
  g_assert_cmpint (s.numbers.worst, ==, 0);
  g_assert_cmpint (s.numbers.block, ==, 0);
  g_assert_false (s.numbers.is_known[p]);
  finish (&s);
}

/* A ring of n unknowns, x_k = b x_{k+1} with one of them also x_0 x_{n/2} = 12: closed answer x = 12^(1/2) scaled. */
static void
ring (int n)
{
  Solved s = { hl_system_new (), NULL, { 0 } };
  g_autofree int *x = g_new (int, n);
  for (int k = 0; k < n; k++)
    x[k] = hl_system_add_var (s.system, HL_VAR_FLOW, none, 1.0 + 0.01 * k);
  for (int k = 0; k + 1 < n; k++)
    hl_add_linear (s.system, HL_VAR_FLOW, (const int[]) { x[k], x[k + 1] }, (const double[]) { 1.0, -1.01 }, 2, 0.0);
  int constant = hl_system_add_var (s.system, HL_VAR_FLOW, none, NAN);
  hl_system_add_spec (s.system, constant, none, HL_ORIGIN_GIVEN, 12.0);
  hl_add_product (s.system, x[0], x[n - 1], constant);
  run (&s);
  g_assert_cmpint (s.numbers.failed, ==, HL_FAILED_NOT);
  g_assert_cmpint (s.structure->largest, ==, n);
  double last = sqrt (12.0 / pow (1.01, n - 1));
  test_assert_near (s.system->x[x[n - 1]], last, 1e-10);
  test_assert_near (s.system->x[x[0]], last * pow (1.01, n - 1), 1e-10);
  g_assert_cmpfloat (s.numbers.condition, <, 1e8);
  finish (&s);
}

static void
test_blocks_small_and_large (void)
{
  ring (2);
  ring (7);
  ring (20);
  ring (21);      /* from here on by KLU */
  ring (150);
}

/* Square in structure, but its equations say one thing: both sizes name what is not held. */
static void
singular (int n)
{
  Solved s = { hl_system_new (), NULL, { 0 } };
  g_autofree int *x = g_new (int, n);
  for (int k = 0; k < n; k++)
    x[k] = hl_system_add_var (s.system, HL_VAR_FLOW, none, 1.0 + k);
  for (int k = 0; k < n; k++)
    hl_add_linear (s.system, HL_VAR_FLOW, (const int[]) { x[k], x[(k + 1) % n] }, (const double[]) { 1.0, -1.0 }, 2, 0.0);
  run (&s);
  g_assert_cmpint (s.numbers.failed, ==, HL_FAILED_SINGULAR);
  g_assert_cmpint (s.numbers.n_null, ==, MIN (n, HL_NULL_MOST));
  g_assert_cmpfloat (s.numbers.condition, >, 1e12);
  finish (&s);
}

static void
test_singular_blocks (void)
{
  singular (2);
  singular (10);
  singular (40);
}

/* State from pressure and entropy while the pressure comes from the same state's volume: two unknowns, from far away. */
static void
test_states_from_far_away (void)
{
  HlState st;
  g_assert_cmpint (hl_fluid_state_pT (hl_fluid_water (), 30e5, 700.0, &st), ==, HL_OK);
  for (double p0 = 1e5; p0 < 2e7; p0 *= 2.0)
    {
      Solved s = { hl_system_new (), NULL, { 0 } };
      int p = hl_system_add_var (s.system, HL_VAR_PRESSURE, none, log (p0)), h = hl_system_add_var (s.system, HL_VAR_ENTHALPY, none, 2.9e6);
      int en = hl_system_add_var (s.system, HL_VAR_ENTROPY, none, NAN), v = hl_system_add_var (s.system, HL_VAR_VOLUME, none, NAN);
      hl_add_entropy (s.system, hl_fluid_water (), p, h, en);
      hl_add_volume (s.system, hl_fluid_water (), p, h, v);
      hl_system_add_spec (s.system, en, none, HL_ORIGIN_GIVEN, st.s);
      hl_system_add_spec (s.system, v, none, HL_ORIGIN_GIVEN, st.v);
      run (&s);
      g_assert_cmpint (s.numbers.failed, ==, HL_FAILED_NOT);
      test_assert_near (hl_system_value (s.system, p), 30e5, 1e-7);
      finish (&s);
    }
}

int
main (int argc, char **argv)
{
  g_test_init (&argc, &argv, NULL);
  g_test_add_func ("/engine/numbers/one-unknown-from-any-start", test_one_unknown_from_any_start);
  g_test_add_func ("/engine/numbers/one-unknown-without-answer", test_one_unknown_without_answer);
  g_test_add_func ("/engine/numbers/blocks-small-and-large", test_blocks_small_and_large);
  g_test_add_func ("/engine/numbers/singular-blocks", test_singular_blocks);
  g_test_add_func ("/engine/numbers/states-from-far-away", test_states_from_far_away);
  return g_test_run ();
}
