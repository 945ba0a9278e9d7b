/* The saturation line that the diagram draws lies where the formulation has it, and is smooth up to its top.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "cycle-fixtures.h"
#include <math.h>

static void
test_points_lie_on_the_saturation_line (void)
{
  const HlFluid *water = hl_fluid_water ();
  const HlDome *dome = hl_dome_of (water);
  g_assert_cmpuint (dome->n, >, 100);
  for (guint i = 0; i + 1 < dome->n; i++)
    {
      HlState liquid, vapour, compressed, dry;
      g_assert_cmpint (hl_fluid_state_Tx (water, dome->T[i], 0.0, &liquid), ==, HL_OK);
      g_assert_cmpint (hl_fluid_state_Tx (water, dome->T[i], 1.0, &vapour), ==, HL_OK);
      g_assert_cmpfloat (fabs (dome->s_liquid[i] - liquid.s), <, 1e-6);
      g_assert_cmpfloat (fabs (dome->s_vapour[i] - vapour.s), <, 1e-6);
      if (dome->T[i] > 640.0)
        continue;
      /* From both sides, by (p,T): a millionth of the pressure away the entropy has hardly changed. */
      g_assert_cmpint (hl_fluid_state_pT (water, liquid.p * (1.0 + 1e-6), dome->T[i], &compressed), ==, HL_OK);
      g_assert_cmpint (hl_fluid_state_pT (water, liquid.p * (1.0 - 1e-6), dome->T[i], &dry), ==, HL_OK);
      g_assert_cmpfloat (fabs (dome->s_liquid[i] - compressed.s), <, 0.05);
      g_assert_cmpfloat (fabs (dome->s_vapour[i] - dry.s), <, 0.05);
    }
}

/* IAPWS SR4-04(2014), section 2: s_c = 4.412 021 482 234 76 kJ/(kg K) by equation (28) of IF97 at 647.096 K and 322 kg/m3. */
static void
test_top_is_the_critical_point (void)
{
  const HlDome *dome = hl_dome_of (hl_fluid_water ());
  guint top = dome->n - 1;
  g_assert_cmpfloat_with_epsilon (dome->T[top], 647.096, 1e-9);
  g_assert_cmpfloat_with_epsilon (dome->s_liquid[top], 4412.02148223476, 1.0);
  g_assert_cmpfloat_with_epsilon (dome->s_vapour[top], dome->s_liquid[top], 1e-12);
}

static void
test_branches_run_one_way (void)
{
  const HlDome *dome = hl_dome_of (hl_fluid_water ());
  for (guint i = 1; i < dome->n; i++)
    {
      g_assert_cmpfloat (dome->T[i], >, dome->T[i - 1]);
      g_assert_cmpfloat (dome->s_liquid[i], >, dome->s_liquid[i - 1]);
      g_assert_cmpfloat (dome->s_vapour[i], <, dome->s_vapour[i - 1]);
    }
}

/* No kink: at the largest usual size the line turns by less than a few degrees from point to point. */
static void
test_outline_turns_gently (void)
{
  g_autoptr (HlCycle) cycle = hl_cycle_new (NULL, HL_UNITS_METRIC);
  g_autoptr (HlStateDiagram) diagram = hl_state_diagram_from_cycle (cycle, 1600.0, 1000.0);
  double last_angle = NAN, sum = 0.0;
  HlPoint last = { 0.0, 0.0 };
  for (guint i = 0; i < hl_plot_series_n (diagram->outline); i++)
    {
      const HlPoint *point = hl_plot_series_point (diagram->outline, i);
      HlPoint at;
      double angle;
      hl_state_diagram_to_pixel (diagram, point->x, point->y, &at.x, &at.y);
      if (i > 0 && hypot (at.x - last.x, at.y - last.y) > 0.0)
        {
          angle = atan2 (at.y - last.y, at.x - last.x);
          if (isfinite (last_angle))
            {
              /* The axis points down: a dome turns clockwise on the way up; its skirt turns back a little. */
              g_assert_cmpfloat (fabs (angle - last_angle), <, 4.0 * G_PI / 180.0);
              sum += angle - last_angle;
            }
          last_angle = angle;
        }
      last = at;
    }
  g_assert_cmpfloat (sum, >, 60.0 * G_PI / 180.0);
}

static void
test_entropy_between_points (void)
{
  const HlFluid *water = hl_fluid_water ();
  const HlDome *dome = hl_dome_of (water);
  for (double T = 280.0; T < 646.0; T += 7.3)
    for (double x = 0.0; x <= 1.0; x += 0.25)
      {
        HlState state;
        g_assert_cmpint (hl_fluid_state_Tx (water, T, x, &state), ==, HL_OK);
        /* 5 J/(kg K) is half a pixel of a diagram 1000 pixels wide. */
        g_assert_cmpfloat (fabs (hl_dome_entropy (dome, T, x) - state.s), <, 5.0);
      }
  g_assert_cmpfloat_with_epsilon (hl_dome_entropy (dome, 1000.0, 0.3), dome->s_liquid[dome->n - 1], 1e-9);
}

static gpointer
ask (gpointer data)
{
  return (gpointer) hl_dome_of (data);
}

static void
test_threads_share_one_dome (void)
{
  GThread *threads[6];
  for (guint i = 0; i < G_N_ELEMENTS (threads); i++)
    threads[i] = g_thread_new ("dome", ask, (gpointer) hl_fluid_water ());
  for (guint i = 0; i < G_N_ELEMENTS (threads); i++)
    g_assert_true (g_thread_join (threads[i]) == (gpointer) hl_dome_of (hl_fluid_water ()));
}

int
main (int argc, char **argv)
{
  g_test_init (&argc, &argv, NULL);
  g_test_add_func ("/draw/state-diagram-dome/threads-share-one-dome", test_threads_share_one_dome);
  g_test_add_func ("/draw/state-diagram-dome/points-lie-on-the-saturation-line", test_points_lie_on_the_saturation_line);
  g_test_add_func ("/draw/state-diagram-dome/top-is-the-critical-point", test_top_is_the_critical_point);
  g_test_add_func ("/draw/state-diagram-dome/branches-run-one-way", test_branches_run_one_way);
  g_test_add_func ("/draw/state-diagram-dome/outline-turns-gently", test_outline_turns_gently);
  g_test_add_func ("/draw/state-diagram-dome/entropy-between-points", test_entropy_between_points);
  return g_test_run ();
}
