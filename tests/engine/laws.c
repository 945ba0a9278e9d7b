/* Laws that every plant of a test must keep: derivatives, balances, any quantity given for any other.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "laws.h"
#include <math.h>
#include <string.h>

/* Central difference with two steps: the smaller error of both counts, so that neither rounding nor curvature decides. */
void
test_check_equation (const HlSystem *system, int number)
{
  const HlEquation *e = hl_system_equation (system, number);
  const double *a = &g_array_index (system->constants, double, e->first_constant);
  const int *vars = hl_equation_vars (system, e);
  double x[HL_EQUATION_MOST], dr[HL_EQUATION_MOST], unused[HL_EQUATION_MOST], r, up, down;
  double scale = hl_system_scale (system, e->kind);
  for (int k = 0; k < e->n; k++)
    x[k] = system->x[vars[k]];
  if (e->residual (e, a, x, &r, dr) != HL_OK)
    return;
  for (int k = 0; k < e->n; k++)
    {
      double unit = hl_system_scale (system, hl_system_var (system, vars[k])->kind), best = INFINITY;
      for (int step = 0; step < 3; step++)
        {
          double h = unit * (step == 0 ? 1e-5 : step == 1 ? 1e-6 : 1e-7), keep = x[k];
          x[k] = keep + h;
          HlStatus above = e->residual (e, a, x, &up, unused);
          x[k] = keep - h;
          HlStatus below = e->residual (e, a, x, &down, unused);
          x[k] = keep;
          if (above != HL_OK || below != HL_OK)
            continue;
          best = fmin (best, fabs ((up - down) / (2.0 * h) - dr[k]) * unit / scale / (1e-3 + fabs (dr[k]) * unit / scale));
        }
      if (isfinite (best) && !(best < 2e-5))
        g_error ("equation %d (%s) of component %d: derivative %d is %.10g, off by %.2e", number, e->says != NULL ? e->says : "terms", e->component, k, dr[k], best);
    }
}

/* At the solution a state may sit on the saturation line, where it has two slopes: look beside it. */
void
test_check_derivatives (const char *text)
{
  g_autoptr (HlPlant) plant = test_plant (text);
  g_autoptr (HlSolution) solution = hl_solve (plant, NULL);
  g_autoptr (GRand) rand = g_rand_new_with_seed (7);
  test_assert_solved (solution);
  HlSystem *system = solution->model->system;
  g_autofree double *at = g_memdup2 (system->x, sizeof (double) * system->vars->len);
  for (int round = 0; round < 20; round++)
    {
      for (guint v = 0; v < system->vars->len; v++)
        system->x[v] = at[v] + hl_system_scale (system, hl_system_var (system, v)->kind) * g_rand_double_range (rand, -3e-3, 3e-3);
      for (guint k = 0; k < system->equations->len; k++)
        test_check_equation (system, (int) k);
    }
}

/* What comes in is made, lost or destroyed, in each component and in the plant; nothing is destroyed backwards. */
static void
assert_second_law (const HlSolution *s)
{
  double in = 0.0, out = 0.0;
  g_assert_cmpuint (hl_solution_n_exergy_flows (s), >, 0);
  for (guint k = 0; k < hl_solution_n_exergy_flows (s); k++)
    {
      const HlExergyFlow *flow = hl_solution_exergy_flow (s, k);
      *(flow->kind < HL_EXERGY_DESTRUCTION ? &in : &out) += flow->power;
    }
  if (!(fabs (in - out) <= 1e-9 * in))
    g_error ("exergy of the plant: %.12g W in, %.12g W made, lost and destroyed", in, out);
  for (guint c = 0; c < hl_plant_n_components (hl_solution_plant (s)); c++)
    {
      HlExergyBalance b;
      const char *id = hl_plant_component (hl_solution_plant (s), c)->id;
      if (!hl_solution_exergy (s, c, &b))
        g_error ("exergy of %s is not known", id);
      if (!(fabs (b.fuel - b.product - b.loss - b.destruction) <= 1e-9 * in))
        g_error ("exergy of %s: fuel %.12g, product %.12g, loss %.12g, destruction %.12g W", id, b.fuel, b.product, b.loss, b.destruction);
      if (!(b.destruction >= -1e-9 * in) || !(b.fuel >= -1e-9 * in) || !(b.loss >= 0.0))
        g_error ("exergy of %s: destruction %.12g, fuel %.12g, loss %.12g W", id, b.destruction, b.fuel, b.loss);
    }
}

void
test_assert_balanced (const HlSolution *s)
{
  double mass, energy;
  assert_second_law (s);
  hl_solution_balances (s, &mass, &energy);
  g_assert_cmpfloat (fabs (mass), <, 1e-9);
  g_assert_cmpfloat (fabs (energy), <, 1e-9);
}

/* Any quantity that was found may be given, and what then yields is found as it was.
 * All typed values are made assumed first, so that something can yield. */
static HlPlant *
all_assumed (const char *text)
{
  HlPlant *plant = test_plant (text);
  for (guint c = 0; c < hl_plant_n_components (plant); c++)
    {
      HlComponent *component = hl_component_copy (hl_plant_component (plant, c));
      for (guint k = 0; k < component->values.n; k++)
        component->values.entries[k].value.origin = HL_ORIGIN_ASSUMED;
      HlPlant *next = hl_plant_with_component (plant, component);
      hl_plant_unref (plant);
      plant = next;
    }
  g_autoptr (HlPlant) typed = hl_plant_ref (plant);
  const HlValues *values = hl_plant_values (typed);
  for (guint k = 0; k < values->n; k++)
    {
      HlAddress address = hl_address_plant (values->entries[k].key);
      HlValue value = { .origin = HL_ORIGIN_ASSUMED, .value = values->entries[k].value.value };
      HlPlant *next = hl_plant_with_value (plant, &address, &value, NULL);
      hl_plant_unref (plant);
      plant = next;
    }
  return plant;
}

static gboolean
gives_back (HlPlant *plant, const HlSolution *s, const HlAddress *address, double value)
{
  HlValue given = { .origin = HL_ORIGIN_GIVEN, .value = value };
  g_autoptr (GError) error = NULL;
  g_autoptr (HlPlant) typed = hl_plant_with_value (plant, address, &given, &error);
  g_autofree char *text = hl_address_to_text (address);
  if (typed == NULL)
    return FALSE;
  GArray *yielded;
  g_autoptr (HlPlant) settled = hl_settle (typed, address, &yielded);
  g_assert_cmpuint (yielded->len, <=, 1);
  g_autoptr (HlSolution) t = hl_solve (settled, s);
  if (!hl_solution_is_solved (t))
    {
      for (guint k = 0; k < yielded->len; k++)
        g_printerr ("# %s\n", g_array_index (yielded, HlYield, k).text);
      g_array_unref (yielded);
      test_print (t);
      g_error ("not solved with %s given", text);
    }
  g_array_unref (yielded);
  double now;
  g_assert_true (hl_solution_value (t, address, &now));
  if (!(fabs (now - value) <= 1e-8 * fabs (value)))
    g_error ("%s is %.10g, not the %.10g that was given", text, now, value);
  test_assert_balanced (t);
  return TRUE;
}

guint
test_give_each (const char *text)
{
  guint n_given = 0;
  g_autoptr (HlPlant) plant = all_assumed (text);
  g_autoptr (HlSolution) s = hl_solve (plant, NULL);
  test_assert_solved (s);
  for (guint c = 0; c < hl_plant_n_components (plant); c++)
    {
      const HlComponent *component = hl_plant_component (plant, c);
      for (guint k = 0; k < hl_component_n_quantities (component); k++)
        {
          HlAddress address = hl_address_component (component->id, hl_component_quantity (component, k).key);
          double value;
          /* Zero losses and zero flows are no size to give; a shaft's pump has no motor power. */
          if (hl_plant_value (plant, &address) != NULL || !hl_solution_value (s, &address, &value) || !(fabs (value) > 1e-9)
              || (hl_component_quantity (component, k).kind->flags & HL_QUANTITY_DERIVED))
            continue;
          n_given += gives_back (plant, s, &address, value);
        }
    }
  guint n;
  const HlQuantityKind *kinds = hl_plant_quantities (&n);
  for (guint k = 0; k < n; k++)
    {
      HlAddress address = hl_address_plant (g_intern_string (kinds[k].key));
      double value;
      if (hl_plant_value (plant, &address) != NULL || !hl_solution_value (s, &address, &value) || !(fabs (value) > 1e-9)
          || (kinds[k].flags & HL_QUANTITY_DERIVED) || g_str_equal (kinds[k].key, "exhaust_moisture"))
        continue;
      n_given += gives_back (plant, s, &address, value);
    }
  return n_given;
}

void
test_expect_finding (const char *text, const char *code, HlGrade grade, const char *part)
{
  g_autoptr (HlPlant) plant = test_plant (text);
  g_autoptr (HlSolution) s = hl_solve (plant, NULL);
  const HlFinding *finding = test_finding (s, code);
  if (finding == NULL)
    test_print (s);
  g_assert_nonnull (finding);
  g_assert_cmpint (finding->grade, ==, grade);
  if (strstr (finding->text, part) == NULL)
    g_error ("\"%s\" lacks \"%s\"", finding->text, part);
}
