/* Every form of equation: derivatives against differences of its own residual, and closed answers where there are any.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "laws.h"
#include "engine/equations.h"
#include "engine/model.h"
#include "engine/solution-private.h"
#include <math.h>
#include <string.h>

static void
test_derivatives_in_plants (void)
{
  test_check_derivatives (test_simple_loop);
  test_check_derivatives (test_reheat_plant);
  test_check_derivatives (test_large_plant);
  test_check_derivatives (test_industrial_plant);
}

#define STRAIGHT_LINE "heat_input Q1 pressure_loss=0 steam.p=60e5 steam.T=750 steam.m=10\n" \
  "turbine T1 extractions:2 expansion:1 extraction1.p=12e5 extraction2.p=2e5 exhaust.p=1e4 isentropic_efficiency=0.8 mechanical_efficiency=1 extraction1.m=1 extraction2.m=1\n" \
  "boundary Y1 direction:0 outlet.T=400\nboundary Y2 direction:1\nboundary Y3 direction:1\nboundary Y4 direction:1\n" \
  "Y1.outlet > Q1.feed\nQ1.steam > T1.inlet\nT1.extraction1 > Y2.inlet\nT1.extraction2 > Y3.inlet\nT1.exhaust > Y4.inlet\nplant other_consumption_fraction=0\n"

static void
test_straight_line (void)
{
  test_check_derivatives (STRAIGHT_LINE);
  g_autoptr (HlPlant) plant = test_plant (STRAIGHT_LINE);
  g_autoptr (HlSolution) s = hl_solve (plant, NULL);
  double h1 = test_value (s, "T1.inlet.h"), s1 = test_value (s, "T1.inlet.s"), h2 = test_value (s, "T1.exhaust.h"), s2 = test_value (s, "T1.exhaust.s");
  test_assert_near ((test_value (s, "T1.extraction1.h") - h1) / (h2 - h1), (test_value (s, "T1.extraction1.s") - s1) / (s2 - s1), 1e-9);
  test_assert_near ((test_value (s, "T1.extraction2.h") - h1) / (h2 - h1), (test_value (s, "T1.extraction2.s") - s1) / (s2 - s1), 1e-9);
  test_assert_near (test_value (s, "T1.extraction1.p"), 12e5, 1e-12);
  HlState ideal;
  g_assert_cmpint (hl_fluid_state_ps (hl_fluid_water (), 1e4, s1, &ideal), ==, HL_OK);
  test_assert_near ((h1 - h2) / (h1 - ideal.h), 0.8, 1e-9);
}

/* States named by T, s, x, v and moisture, by values and by ties, so that all their forms come about. */
static void
test_state_conditions (void)
{
  test_check_derivatives ("boundary Y1 direction:0 outlet.p=10e5 outlet.s=6800 outlet.m=1\nboundary Y2 direction:1\nY1.outlet > Y2.inlet\n");
  test_check_derivatives ("boundary Y1 direction:0 outlet.p=10e5 outlet.v=0.25 outlet.m=1\nboundary Y2 direction:1\nY1.outlet > Y2.inlet\n");
  test_check_derivatives ("boundary Y1 direction:0 outlet.p=10e5 outlet.x=0.9 outlet.m=1\nboundary Y2 direction:1\nY1.outlet > Y2.inlet\n");
  test_check_derivatives ("heat_input Q1 pressure_loss=0 steam.p=60e5 steam.T=750 steam.m=10\nturbine T1 exhaust_moisture=0.08 exhaust.p=1e4 mechanical_efficiency=1\n"
               "boundary Y1 direction:0 outlet.T=400\nboundary Y2 direction:1\nY1.outlet > Q1.feed\nQ1.steam > T1.inlet\nT1.exhaust > Y2.inlet\nplant other_consumption_fraction=0\n");
}

static void
test_entropy_and_volume_given (void)
{
  g_autoptr (HlPlant) plant = test_plant ("boundary Y1 direction:0 outlet.p=10e5 outlet.s=6800 outlet.m=1\nboundary Y2 direction:1\nY1.outlet > Y2.inlet\n");
  g_autoptr (HlSolution) s = hl_solve (plant, NULL);
  test_assert_near (test_value (s, "Y1.outlet.s"), 6800.0, 1e-10);
  g_autoptr (HlPlant) other = test_plant ("boundary Y1 direction:0 outlet.p=10e5 outlet.v=0.25 outlet.m=1\nboundary Y2 direction:1\nY1.outlet > Y2.inlet\n");
  g_autoptr (HlSolution) v = hl_solve (other, NULL);
  test_assert_solved (v);
  test_assert_near (test_value (v, "Y2.inlet.v"), 0.25, 1e-10);
}

static void
test_log_mean (void)
{
  double a, b;
  test_assert_near (hl_log_mean (20.0, 10.0, &a, &b), 10.0 / log (2.0), 1e-14);
  test_assert_near (hl_log_mean (10.0, 10.0, &a, &b), 10.0, 1e-14);
  test_assert_near (a, 0.5, 1e-12);
  test_assert_near (b, 0.5, 1e-12);
  /* Both formulas agree where they meet, at a ratio of differences of one per cent of their mean. */
  double below = hl_log_mean (10.0 * 1.00499, 10.0 * 0.99501, &a, &b), above = hl_log_mean (10.0 * 1.00501, 10.0 * 0.99499, &a, &b);
  g_assert_cmpfloat (fabs (below - above), <, 1e-5);
  test_assert_near (hl_log_mean (10.05, 9.95005, &a, &b), 0.09995 / log (10.05 / 9.95005), 1e-11);
  /* Below zero it keeps falling, so that an iteration is driven back. */
  double before = hl_log_mean (5.0, 1e-2, &a, &b);
  for (double d = 0.0; d > -50.0; d -= 0.5)
    {
      double now = hl_log_mean (5.0, d, &a, &b);
      g_assert_cmpfloat (now, <, before);
      before = now;
    }
  for (double d1 = -10.0; d1 < 30.0; d1 += 1.7)
    for (double d2 = -9.0; d2 < 30.0; d2 += 1.3)
      {
        double u, v, h = 1e-6;
        hl_log_mean (d1, d2, &a, &b);
        g_assert_cmpfloat (fabs ((hl_log_mean (d1 + h, d2, &u, &v) - hl_log_mean (d1 - h, d2, &u, &v)) / (2 * h) - a), <, 1e-6);
        g_assert_cmpfloat (fabs ((hl_log_mean (d1, d2 + h, &u, &v) - hl_log_mean (d1, d2 - h, &u, &v)) / (2 * h) - b), <, 1e-6);
      }
}

/* A drain that would be hotter than saturation continues the liquid line, without a step at saturation. */
static void
test_liquid_is_continuous (void)
{
  g_autoptr (HlSystem) system = hl_system_new ();
  HlAddress none = hl_address_plant (g_intern_static_string (""));
  int p = hl_system_add_var (system, HL_VAR_PRESSURE, none, log (35e5)), sub = hl_system_add_var (system, HL_VAR_TEMPERATURE_DIFFERENCE, none, 0.0);
  int h = hl_system_add_var (system, HL_VAR_ENTHALPY, none, 1e6);
  hl_add_liquid (system, hl_fluid_water (), p, sub, h);
  hl_system_close (system);
  double r, dr[3], last = NAN;
  for (double d = 30.0; d > -30.0; d -= 0.25)
    {
      system->x[sub] = d;
      g_assert_cmpint (hl_system_evaluate (system, 0, &r, dr), ==, HL_OK);
      g_assert_cmpfloat (dr[1], >, 0.0);
      if (!isnan (last))
        g_assert_true (r < last && last - r < 1600.0);
      last = r;
    }
}

static void
test_ties (void)
{
  g_autoptr (HlSystem) system = hl_system_new ();
  HlAddress none = hl_address_plant (g_intern_static_string (""));
  int p = hl_system_add_var (system, HL_VAR_PRESSURE, none, log (4e5)), q = hl_system_add_var (system, HL_VAR_PRESSURE, none, log (1e5));
  int T = hl_system_add_var (system, HL_VAR_TEMPERATURE, none, 400.0), U = hl_system_add_var (system, HL_VAR_TEMPERATURE, none, 500.0);
  HlAddress of = hl_address_plant ("net_power");
  hl_add_tie (system, p, hl_tie_linear (&of, 3.0, 1e5), &q);
  hl_add_tie (system, T, hl_tie_linear (&of, 1.0, -100.0), &U);
  hl_add_tie (system, T, hl_tie_linear (&of, 1e-3, 0.0), &p);
  hl_add_tie (system, q, hl_tie_linear (&of, 250.0, 0.0), &T);
  hl_system_close (system);
  for (int k = 0; k < 4; k++)
    {
      double r, dr[2];
      g_assert_cmpint (hl_system_evaluate (system, k, &r, dr), ==, HL_OK);
      g_assert_cmpfloat (fabs (r), <, 1e-9);
      test_check_equation (system, k);
    }
}

/* Several quantities, pressures among them, which are carried as logarithms. */
static void
test_ties_of_several (void)
{
  static const struct { const char *target, *text; } rows[] = {
    { "D1.steam.p", "=sqrt(B1.steam.p*C1.steam.p) + 0.1 bar" },
    { "D1.steam.p", "=max(0.1*B1.steam.p; 3*C1.steam.p)" },
    { "P1.power", "=P1.inlet.m*(P1.outlet.h - P1.inlet.h) + 0.001*B1.steam.m*B1.steam.h" },
    { "C1.cooling_rise", "=(B1.steam.T - C1.steam.T)/50 - 1 K" },
    { "T1.isentropic_efficiency", "=0.9 - 0.1*C1.steam.p/B1.steam.p" },
  };
  for (gsize i = 0; i < G_N_ELEMENTS (rows); i++)
    {
      g_autoptr (HlPlant) plant = test_plant (test_reheat_plant);
      HlAddress target;
      HlValue value;
      g_autoptr (GError) error = NULL;
      hl_address_parse (rows[i].target, plant, &target, &error);
      g_assert_no_error (error);
      hl_value_parse (plant, &target, rows[i].text, &value, &error);
      g_assert_no_error (error);
      g_autoptr (HlPlant) tied = hl_plant_with_value (plant, &target, &value, &error);
      g_assert_no_error (error);
      g_autoptr (HlModel) model = hl_model_new (tied);
      guint found = 0;
      for (guint k = 0; k < model->system->equations->len; k++)
        if (hl_equation_is_tie (hl_system_equation (model->system, k)))
          {
            test_check_equation (model->system, (int) k);
            found++;
          }
      g_assert_cmpuint (found, ==, 1);
    }
}

int
main (int argc, char **argv)
{
  g_test_init (&argc, &argv, NULL);
  g_test_add_func ("/engine/equations/derivatives-in-plants", test_derivatives_in_plants);
  g_test_add_func ("/engine/equations/straight-line", test_straight_line);
  g_test_add_func ("/engine/equations/state-conditions", test_state_conditions);
  g_test_add_func ("/engine/equations/entropy-and-volume-given", test_entropy_and_volume_given);
  g_test_add_func ("/engine/equations/log-mean", test_log_mean);
  g_test_add_func ("/engine/equations/liquid-is-continuous", test_liquid_is_continuous);
  g_test_add_func ("/engine/equations/ties", test_ties);
  g_test_add_func ("/engine/equations/ties-of-several", test_ties_of_several);
  return g_test_run ();
}
