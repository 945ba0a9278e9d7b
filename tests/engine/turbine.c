/* Turbine: moisture correction and exhaust loss against hand calculations, both ways.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "laws.h"
#include <math.h>

/* A condensing turbine between boundaries; what follows "turbine T1" is put in. */
#define TURBINE(words) \
  "heat_input Q1 pressure_loss=0 steam.p=60e5 steam.T=750 steam.m=10\n" \
  "turbine T1 wetness:1 exhaust.p=7000 isentropic_efficiency=0.85 mechanical_efficiency=0.99 " words "\n" \
  "generator G1 efficiency=0.98\nboundary Y1 direction:0 outlet.T=400\nboundary Y2 direction:1\n" \
  "Y1.outlet > Q1.feed\nQ1.steam > T1.inlet\nT1.exhaust > Y2.inlet\nshaft T1 G1\nplant other_consumption_fraction=0\n"

static HlState
ph (double p, double h)
{
  HlState st;
  g_assert_cmpint (hl_fluid_state_ph (hl_fluid_water (), p, h, &st), ==, HL_OK);
  return st;
}

static double
h_ps (double p, double s)
{
  HlState st;
  g_assert_cmpint (hl_fluid_state_ps (hl_fluid_water (), p, s, &st), ==, HL_OK);
  return st.h;
}

static HlSaturation
sat (double p)
{
  HlSaturation at;
  g_assert_cmpint (hl_fluid_saturation_p (hl_fluid_water (), p, &at), ==, HL_OK);
  return at;
}

/* Baumann 1921 step by step: where the dry line meets the saturated vapour, by bisection; from there the mean moisture takes its
 * part of the drop, repeated until it stands still. */
static double
by_hand (double p_in, double h_in, double p_out, double eta, double a)
{
  HlState in = ph (p_in, h_in);
  double high = p_in, low = p_out, y_start = 0.0, h = h_in, s = in.s;
  if (h_in < sat (p_in).h_vapour)
    y_start = 1.0 - in.x;
  else
    {
      for (int round = 0; round < 60; round++)
        {
          double p = sqrt (low * high);
          if (h_in - eta * (h_in - h_ps (p, in.s)) > sat (p).h_vapour)
            high = p;
          else
            low = p;
        }
      h = sat (low).h_vapour;
      s = sat (low).s_vapour;
    }
  double drop = h - h_ps (p_out, s), plain = h_in - eta * (h_in - h_ps (p_out, in.s)), h_out = plain;
  for (int round = 0; round < 60; round++)
    {
      double y = (sat (p_out).h_vapour - h_out) / (sat (p_out).h_vapour - sat (p_out).h_liquid);
      h_out = plain + eta * a * 0.5 * (y_start + y) * drop;
    }
  return h_out;
}

static void
test_baumann_by_hand (void)
{
  g_autoptr (HlPlant) plant = test_plant (TURBINE ("baumann_factor=1"));
  g_autoptr (HlSolution) s = hl_solve (plant, NULL);
  test_assert_solved (s);
  double h_in = test_value (s, "T1.inlet.h"), h_out = test_value (s, "T1.exhaust.h");
  test_assert_near (h_out, by_hand (60e5, h_in, 7000.0, 0.85, 1.0), 1e-8);
  /* The whole efficiency is what a checker would divide. */
  test_assert_near (test_value (s, "T1.overall_efficiency"), (h_in - h_out) / (h_in - h_ps (7000.0, ph (60e5, h_in).s)), 1e-9);
  g_assert_cmpfloat (test_value (s, "T1.overall_efficiency"), <, 0.84);
  /* A factor of nothing is the plain expansion. */
  g_autoptr (HlPlant) zero = test_plant (TURBINE ("baumann_factor=0"));
  g_autoptr (HlSolution) z = hl_solve (zero, NULL);
  test_assert_near (test_value (z, "T1.overall_efficiency"), 0.85, 1e-10);
  /* Saturated steam is wet from the inlet on: eta (1 - a (y_in + y_out) / 2) over the whole drop. */
  g_autoptr (HlPlant) wet_plant = test_plant_set (test_plant_let_go (test_plant (TURBINE ("baumann_factor=0.8")), "Q1.steam.T"), "Q1.steam.x", 0.97);
  g_autoptr (HlSolution) wet = hl_solve (wet_plant, NULL);
  test_assert_solved (wet);
  h_in = test_value (wet, "T1.inlet.h");
  test_assert_near (test_value (wet, "T1.exhaust.h"), by_hand (60e5, h_in, 7000.0, 0.85, 0.8), 1e-9);
  double y = 0.5 * (0.03 + test_value (wet, "T1.exhaust_moisture"));
  test_assert_near (test_value (wet, "T1.overall_efficiency"), 0.85 * (1.0 - 0.8 * y), 1e-9);
}

/* Dry steam knows nothing of it; and where the exhaust turns wet, nothing jumps. */
static void
test_baumann_comes_and_goes (void)
{
  double last = NAN;
  for (double p = 3e5; p > 0.3e5; p *= 0.98)
    {
      g_autoptr (HlPlant) plant = test_plant_set (test_plant (TURBINE ("baumann_factor=2")), "T1.exhaust.p", p);
      g_autoptr (HlPlant) plain = test_plant_set (test_plant (TURBINE ("baumann_factor=0")), "T1.exhaust.p", p);
      g_autoptr (HlSolution) s = hl_solve (plant, NULL), t = hl_solve (plain, NULL);
      test_assert_solved (s);
      double more = test_value (s, "T1.exhaust.h") - test_value (t, "T1.exhaust.h");
      if (test_value (t, "T1.exhaust_moisture") <= 0.0)
        g_assert_cmpfloat (fabs (more), <, 1e-3);
      else
        g_assert_cmpfloat (more, >, 0.0);
      if (!isnan (last))
        g_assert_cmpfloat (fabs (more - last), <, 500.0);
      last = more;
    }
  g_assert_cmpfloat (last, >, 1000.0);
}

static void
test_exhaust_loss (void)
{
  g_autoptr (HlPlant) plant = test_plant (TURBINE ("leaving_loss:1 exhaust_loss=30e3 baumann_factor=1"));
  g_autoptr (HlPlant) plain = test_plant (TURBINE ("baumann_factor=1"));
  g_autoptr (HlSolution) s = hl_solve (plant, NULL), t = hl_solve (plain, NULL);
  test_assert_solved (s);
  test_assert_near (test_value (s, "T1.exhaust.h"), test_value (t, "T1.exhaust.h") + 30e3, 1e-10);
  test_assert_near (test_value (s, "T1.expansion_end_h"), test_value (t, "T1.exhaust.h"), 1e-10);
  test_assert_near (test_value (s, "T1.internal_power"), test_value (t, "T1.internal_power") - 10.0 * 30e3, 1e-9);
  test_assert_near (test_value (s, "T1.exhaust_moisture"), test_value (t, "T1.exhaust_moisture"), 1e-9);
  /* On the diagram: down to the end of the expansion, and on to the exhaust at its pressure. */
  guint n_found = 0;
  for (guint k = 0; k + 1 < hl_solution_n_processes (s); k++)
    {
      const HlProcess *down = hl_solution_process (s, k), *on = hl_solution_process (s, k + 1);
      if (down->kind != HL_PROCESS_EXPANSION)
        continue;
      g_assert_cmpint (down->to_stream, ==, -1);
      g_assert_true (down->has_isentropic);
      test_assert_near (down->to.h, test_value (s, "T1.expansion_end_h"), 1e-9);
      g_assert_cmpint (on->from_stream, ==, -1);
      test_assert_near (on->to.h, test_value (s, "T1.exhaust.h"), 1e-9);
      test_assert_near (on->from.p, on->to.p, 1e-12);
      n_found++;
    }
  g_assert_cmpuint (n_found, ==, 1);
}

#define LOOP(words) \
  "heat_input Q1 steam.T=758.15 pressure_loss=0\n" \
  "turbine T1 wetness:1 leaving_loss:1 " words " inlet.p=65e5 exhaust.p=7000 isentropic_efficiency=0.83 mechanical_efficiency=0.985\n" \
  "generator G1 efficiency=0.98\ncondenser C1 cooling:1 subcooling=0\npump P1 isentropic_efficiency=0.75 motor_efficiency=0.95\n" \
  "Q1.steam > T1.inlet\nT1.exhaust > C1.steam\nC1.condensate > P1.inlet\nP1.outlet > Q1.feed\n" \
  "shaft T1 G1\nplant net_power=12e6 other_consumption_fraction=0\n"

static void
test_derivatives (void)
{
  test_check_derivatives (TURBINE ("leaving_loss:1 exhaust_loss=30e3 baumann_factor=1"));
  test_check_derivatives ("boundary Y1 direction:0 outlet.p=60e5 outlet.x=0.97 outlet.m=10\n"
                          "turbine T1 wetness:1 exhaust.p=7000 isentropic_efficiency=0.85 baumann_factor=1 mechanical_efficiency=0.99\n"
                          "boundary Y2 direction:1\nY1.outlet > T1.inlet\nT1.exhaust > Y2.inlet\nplant other_consumption_fraction=0\n");
  test_check_derivatives (LOOP ("baumann_factor=1.2 exhaust_loss=20e3"));
}

static void
test_both_ways (void)
{
  g_assert_cmpuint (test_give_each (LOOP ("baumann_factor=1.2 exhaust_loss=20e3")), >, 20);
}

/* The exhaust's moisture is given; the factor, the loss or the efficiency is found. */
static void
test_each_is_found (void)
{
  static const char *const keys[] = { "T1.baumann_factor", "T1.isentropic_efficiency", "T1.inlet.p" };
  g_autoptr (HlPlant) plant = test_plant (LOOP ("baumann_factor=1.2 exhaust_loss=20e3"));
  g_autoptr (HlSolution) s = hl_solve (plant, NULL);
  test_assert_solved (s);
  double y = test_value (s, "T1.exhaust_moisture");
  for (guint k = 0; k < G_N_ELEMENTS (keys); k++)
    {
      g_autoptr (HlPlant) other = test_plant_set (test_plant_let_go (test_plant (LOOP ("baumann_factor=1.2 exhaust_loss=20e3")), keys[k]), "T1.exhaust_moisture", y);
      g_autoptr (HlSolution) t = hl_solve (other, NULL);
      test_assert_solved (t);
      test_assert_near (test_value (t, keys[k]), test_value (s, keys[k]), 1e-6);
    }
  g_autoptr (HlPlant) other = test_plant_set (test_plant_let_go (test_plant (LOOP ("baumann_factor=1.2 exhaust_loss=20e3")), "T1.exhaust_loss"),
                                              "T1.exhaust.h", test_value (s, "T1.exhaust.h"));
  g_autoptr (HlSolution) t = hl_solve (other, NULL);
  test_assert_solved (t);
  test_assert_near (test_value (t, "T1.exhaust_loss"), 20e3, 1e-6);
}

int
main (int argc, char **argv)
{
  g_test_init (&argc, &argv, NULL);
  g_test_add_func ("/engine/turbine/baumann-by-hand", test_baumann_by_hand);
  g_test_add_func ("/engine/turbine/baumann-comes-and-goes", test_baumann_comes_and_goes);
  g_test_add_func ("/engine/turbine/exhaust-loss", test_exhaust_loss);
  g_test_add_func ("/engine/turbine/derivatives", test_derivatives);
  g_test_add_func ("/engine/turbine/both-ways", test_both_ways);
  g_test_add_func ("/engine/turbine/each-is-found", test_each_is_found);
  return g_test_run ();
}
