/* Structure: order of solving, what is open, what is too much, balances of closed circuits.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "plants.h"
#include "engine/equations.h"
#include "engine/model.h"
#include "engine/structure.h"
#include <math.h>

static const HlAddress none = { HL_OWNER_PLANT, "", "" };

static int
add_var (HlSystem *system)
{
  return hl_system_add_var (system, HL_VAR_RATIO, none, NAN);
}

static void
add_sum (HlSystem *system, int a, int b, int sum)
{
  hl_add_linear (system, HL_VAR_RATIO, (const int[]) { a, b, sum }, (const double[]) { 1.0, 1.0, -1.0 }, 3, 0.0);
}

/* c = a + b, d = c + b with a and b given: two blocks of one, in this order. */
static void
test_triangular_order (void)
{
  g_autoptr (HlSystem) system = hl_system_new ();
  int a = add_var (system), b = add_var (system), c = add_var (system), d = add_var (system);
  add_sum (system, c, b, d);
  add_sum (system, a, b, c);
  hl_system_add_spec (system, a, none, HL_ORIGIN_GIVEN, 1.0);
  hl_system_add_spec (system, b, none, HL_ORIGIN_GIVEN, 2.0);
  hl_system_close (system);
  g_autoptr (HlStructure) s = hl_structure_new (system);
  g_assert_cmpint (s->n_blocks, ==, 2);
  g_assert_cmpint (s->n_missing, ==, 0);
  g_assert_cmpint (s->n_surplus, ==, 0);
  g_assert_cmpint (s->vars[0], ==, c);
  g_assert_cmpint (s->vars[1], ==, d);
  g_assert_cmpint (s->equations[0], ==, 1);
}

static void
test_open_and_over (void)
{
  g_autoptr (HlSystem) system = hl_system_new ();
  int a = add_var (system), b = add_var (system), c = add_var (system), d = add_var (system), e = add_var (system), f = add_var (system);
  add_sum (system, a, b, c);      /* a given: b and c open, one missing */
  add_sum (system, d, e, f);      /* all three given: one too many */
  int specs[] = { a, d, e, f };
  for (int k = 0; k < 4; k++)
    hl_system_add_spec (system, specs[k], none, HL_ORIGIN_GIVEN, 1.0);
  hl_system_close (system);
  g_autoptr (HlStructure) s = hl_structure_new (system);
  g_assert_cmpint (s->n_missing, ==, 1);
  g_assert_true (s->is_open[b] && s->is_open[c] && !s->is_open[a]);
  g_assert_cmpint (s->n_surplus, ==, 1);
  g_assert_cmpint (s->n_over, ==, 1);
  g_assert_cmpint (s->over[0], ==, 1);
}

/* A second value of the same class is one too many, wherever it stands; equals are one unknown. */
static void
test_classes (void)
{
  g_autoptr (HlSystem) system = hl_system_new ();
  int a = add_var (system), b = add_var (system), c = add_var (system);
  hl_system_merge (system, c, b);
  hl_system_merge (system, b, a);
  hl_system_add_spec (system, c, none, HL_ORIGIN_ASSUMED, 3.0);
  hl_system_add_spec (system, b, none, HL_ORIGIN_GIVEN, 4.0);
  hl_system_close (system);
  g_assert_cmpint (system->root[c], ==, a);
  g_assert_cmpfloat (hl_system_value (system, c), ==, 4.0);    /* what is typed stands before what is assumed */
  g_autoptr (HlStructure) s = hl_structure_new (system);
  g_assert_cmpint (s->n_surplus, ==, 1);
  g_assert_cmpint (s->n_missing, ==, 0);
}

/* What nothing else needs is computed last, in an order that works. */
static void
test_outputs_wait (void)
{
  g_autoptr (HlSystem) system = hl_system_new ();
  int a = add_var (system), b = add_var (system), c = add_var (system), d = add_var (system);
  hl_add_product (system, c, c, d);
  hl_add_product (system, a, b, c);
  hl_system_add_spec (system, a, none, HL_ORIGIN_GIVEN, 2.0);
  hl_system_add_spec (system, b, none, HL_ORIGIN_GIVEN, 3.0);
  hl_system_close (system);
  g_autoptr (HlStructure) s = hl_structure_new (system);
  g_assert_cmpint (s->n_blocks, ==, 0);
  g_assert_cmpint (s->n_last, ==, 2);
  g_assert_cmpint (s->last[0], ==, 1);
  g_assert_cmpint (s->last[1], ==, 0);
}

static guint
dropped (const HlSystem *system)
{
  guint n = 0;
  for (guint k = 0; k < system->equations->len; k++)
    n += hl_system_equation (system, k)->is_dropped;
  return n;
}

/* One balance less in a closed circuit, none in one with a boundary. */
static void
test_dependent_balances (void)
{
  g_autoptr (HlPlant) closed = test_plant (test_reheat_plant), open = test_plant (test_industrial_plant), single = test_plant (test_simple_loop);
  g_autoptr (HlModel) a = hl_model_new (closed), b = hl_model_new (open), c = hl_model_new (single);
  g_autoptr (HlStructure) s = hl_structure_new (a->system), t = hl_structure_new (b->system), u = hl_structure_new (c->system);
  g_assert_cmpuint (dropped (a->system), ==, 1);
  g_assert_cmpuint (dropped (b->system), ==, 0);
  g_assert_cmpuint (dropped (c->system), ==, 0);
  g_assert_cmpint (s->n_missing + t->n_missing + u->n_missing, ==, 0);
  g_assert_cmpint (s->n_surplus + t->n_surplus + u->n_surplus, ==, 0);
}

static void
test_nothing (void)
{
  g_autoptr (HlSystem) system = hl_system_new ();
  hl_system_close (system);
  g_autoptr (HlStructure) s = hl_structure_new (system);
  g_assert_cmpint (s->n_blocks + s->n_last + s->n_missing + s->n_surplus, ==, 0);
}

int
main (int argc, char **argv)
{
  g_test_init (&argc, &argv, NULL);
  g_test_add_func ("/engine/structure/triangular-order", test_triangular_order);
  g_test_add_func ("/engine/structure/open-and-over", test_open_and_over);
  g_test_add_func ("/engine/structure/classes", test_classes);
  g_test_add_func ("/engine/structure/outputs-wait", test_outputs_wait);
  g_test_add_func ("/engine/structure/dependent-balances", test_dependent_balances);
  g_test_add_func ("/engine/structure/nothing", test_nothing);
  return g_test_run ();
}
