/* Water and steam on the saturation line and in the mixture.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "csv.h"
#include "water-random.h"

/* The grid's two-phase rows: R7-97 Eq. 30 for psat, above 623.15 K densities
 * from p3(density, T) = psat.  Below 623.15 K both are explicit equations; up to
 * 640 K the other implementation's root search limits the agreement to 1e-6,
 * above to 1e-3 in v, as the grid's own note on tolerances says. */
static void
test_mixtures_agree_with_grid (void)
{
  g_autoptr (Csv) csv = csv_read ("fluid", "data", "grid-if97.csv", NULL);
  guint n = 0;
  double worst_middle = 0.0, worst_high = 0.0;
  for (guint i = 0; i < csv_n_rows (csv); i++)
    {
      HlState by_p, by_T;
      if (!g_str_equal (csv_text (csv, i, "given"), "px"))
        continue;
      double T = csv_number (csv, i, "T[K]"), x = csv_number (csv, i, "x[-]");
      double near = T <= 623.15 ? 1e-9 : T <= 640.0 ? 1e-6 : 1e-3;
      g_assert_cmpint (hl_fluid_state_px (hl_fluid_water (), csv_number (csv, i, "p[MPa]") * 1e6, x, &by_p), ==, HL_OK);
      g_assert_cmpint (hl_fluid_state_Tx (hl_fluid_water (), T, x, &by_T), ==, HL_OK);
      const HlState *both[] = { &by_p, &by_T };
      for (gsize k = 0; k < G_N_ELEMENTS (both); k++)
        {
          csv_assert_near (csv, i, "v[m3/kg]", both[k]->v, near);
          csv_assert_near (csv, i, "h[kJ/kg]", both[k]->h / 1e3, near);
          csv_assert_near (csv, i, "s[kJ/(kg K)]", both[k]->s / 1e3, near);
          csv_assert_near (csv, i, "T[K]", both[k]->T, 1e-9);
          csv_assert_near (csv, i, "p[MPa]", both[k]->p / 1e6, 1e-9);
        }
      double off = fabs (by_p.v / csv_number (csv, i, "v[m3/kg]") - 1.0);
      if (T > 640.0)
        worst_high = fmax (worst_high, off);
      else if (T > 623.15)
        worst_middle = fmax (worst_middle, off);
      n++;
    }
  g_assert_cmpuint (n, ==, 60);
  g_test_message ("largest relative difference of v: %.2g from 623.15 to 640 K, %.2g above", worst_middle, worst_high);
}

/* Above 623.15 K both densities must lie on region 3's isotherm at psat, on
 * their branches; nearer than 1e-4 K to the critical point Eq. 30 lies up to
 * 3e-11 above the isotherm, so that there is no root to meet. */
static void
test_region3_ends_meet_the_saturation_pressure (void)
{
  for (double T = 623.2; T < HL_IF97_T_CRITICAL - 1e-4; T += T < 646.0 ? 0.1 : 0.001)
    {
      HlSaturation sat;
      HlIf97Helmholtz liquid, vapour;
      g_assert_cmpint (hl_fluid_saturation_T (hl_fluid_water (), T, &sat), ==, HL_OK);
      hl_if97_region3_helmholtz (1.0 / sat.v_liquid, T, &liquid);
      hl_if97_region3_helmholtz (1.0 / sat.v_vapour, T, &vapour);
      g_assert_cmpfloat_with_epsilon (liquid.p / hl_if97_psat (T), 1.0, 1e-12);
      g_assert_cmpfloat_with_epsilon (vapour.p / hl_if97_psat (T), 1.0, 1e-12);
      g_assert_cmpfloat (liquid.p_d, >, 0.0);
      g_assert_cmpfloat (vapour.p_d, >, 0.0);
      g_assert_cmpfloat (sat.v_liquid, <, 1.0 / HL_IF97_D_CRITICAL);
      g_assert_cmpfloat (sat.v_vapour, >, 1.0 / HL_IF97_D_CRITICAL);
    }
}

/* Towards the critical point both ends draw together and nothing breaks. */
static void
test_ends_draw_together_at_the_critical_point (void)
{
  double span = 1e-2;
  for (double below = 1.0; below > 1e-9; below *= 0.3)
    {
      HlSaturation sat;
      HlState state;
      double T = HL_IF97_T_CRITICAL - below;
      g_assert_cmpint (hl_fluid_saturation_T (hl_fluid_water (), T, &sat), ==, HL_OK);
      g_assert_cmpfloat (sat.v_vapour - sat.v_liquid, <=, span);
      g_assert_cmpfloat (sat.v_vapour - sat.v_liquid, >=, 0.0);
      span = sat.v_vapour - sat.v_liquid;
      g_assert_cmpint (hl_fluid_saturation_p (hl_fluid_water (), hl_if97_psat (T), &sat), ==, HL_OK);
      g_assert_cmpint (hl_fluid_state_Tx (hl_fluid_water (), T, 0.5, &state), ==, HL_OK);
      g_assert_true (isfinite (state.h) && isfinite (state.s) && isfinite (state.v));
    }
  HlState state;
  HlSaturation sat;
  g_assert_cmpint (hl_fluid_saturation_T (hl_fluid_water (), HL_IF97_T_CRITICAL, &sat), ==, HL_OK);
  g_assert_cmpint (hl_fluid_saturation_p (hl_fluid_water (), HL_IF97_P_CRITICAL, &sat), ==, HL_OK);
  for (double x = 0.0; x <= 1.0; x += 0.25)
    {
      g_assert_cmpint (hl_fluid_state_px (hl_fluid_water (), HL_IF97_P_CRITICAL, x, &state), ==, HL_OK);
      g_assert_cmpfloat_with_epsilon (state.v * HL_IF97_D_CRITICAL, 1.0, 1e-12);
      g_assert_true (isfinite (state.h) && isfinite (state.s) && isfinite (state.T_p));
      g_assert_cmpfloat (state.x, ==, x);
    }
}

static void
assert_slope (const char *what, double T, double slope, double plus, double minus, double step, double relative)
{
  double difference = (plus - minus) / (2.0 * step);
  if (!(fabs (slope - difference) <= relative * fabs (difference)))
    g_error ("%s at %.8g K: %.12g, by differences %.12g", what, T, slope, difference);
}

/* Derivatives along the line against central differences over 1e-5 p: the
 * third derivative gives about 1e-9 of the slope away from the critical point,
 * rounding (1e-14 of h) about 1e-8. */
static void
test_slopes_agree_with_differences (void)
{
  for (double T = 274.0; T < 646.0; T += 0.61)
    {
      if (fabs (T - 623.15) < 0.01)
        continue;
      HlSaturation sat, plus, minus;
      double p = hl_if97_psat (T), step = 1e-5 * p;
      g_assert_cmpint (hl_fluid_saturation_p (hl_fluid_water (), p, &sat), ==, HL_OK);
      g_assert_cmpint (hl_fluid_saturation_p (hl_fluid_water (), p + step, &plus), ==, HL_OK);
      g_assert_cmpint (hl_fluid_saturation_p (hl_fluid_water (), p - step, &minus), ==, HL_OK);
      assert_slope ("T_p", T, sat.T_p, plus.T, minus.T, step, 1e-6);
      assert_slope ("h_liquid_p", T, sat.h_liquid_p, plus.h_liquid, minus.h_liquid, step, 1e-6);
      assert_slope ("s_liquid_p", T, sat.s_liquid_p, plus.s_liquid, minus.s_liquid, step, 1e-6);
      assert_slope ("s_vapour_p", T, sat.s_vapour_p, plus.s_vapour, minus.s_vapour, step, 1e-6);
      assert_slope ("v_vapour_p", T, sat.v_vapour_p, plus.v_vapour, minus.v_vapour, step, 1e-6);
      /* These two have a zero on the line: the volume at 4 degrees C, the enthalpy of vapour at about 509 K. */
      if (T > 285.0)
        assert_slope ("v_liquid_p", T, sat.v_liquid_p, plus.v_liquid, minus.v_liquid, step, 1e-6);
      if (fabs (T - 508.0) > 5.0)
        assert_slope ("h_vapour_p", T, sat.h_vapour_p, plus.h_vapour, minus.h_vapour, step, 1e-6);
    }
}

/* IAPWS R7-97(2012): the equations of regions 1, 2 and 4 were fitted apart, so
 * Clausius-Clapeyron holds to a small mismatch only. */
static void
test_clausius_clapeyron_holds (void)
{
  for (double T = 274.0; T < 646.5; T += 0.5)
    {
      HlSaturation sat;
      g_assert_cmpint (hl_fluid_saturation_T (hl_fluid_water (), T, &sat), ==, HL_OK);
      double slope = T * (sat.v_vapour - sat.v_liquid) / (sat.h_vapour - sat.h_liquid);
      g_assert_cmpfloat_with_epsilon (slope / sat.T_p, 1.0, 2e-3);
    }
}

/* At x = 0 and 1 the state is the saturated liquid or vapour, whole. */
static void
test_ends_are_single_phase_states (void)
{
  for (double T = 280.0; T < 646.0; T += 7.3)
    {
      HlState liquid, vapour;
      HlSaturation sat;
      g_assert_cmpint (hl_fluid_saturation_T (hl_fluid_water (), T, &sat), ==, HL_OK);
      g_assert_cmpint (hl_fluid_state_Tx (hl_fluid_water (), T, 0.0, &liquid), ==, HL_OK);
      g_assert_cmpint (hl_fluid_state_Tx (hl_fluid_water (), T, 1.0, &vapour), ==, HL_OK);
      g_assert_cmpfloat (liquid.h, ==, sat.h_liquid);
      g_assert_cmpfloat (vapour.h, ==, sat.h_vapour);
      g_assert_cmpfloat (liquid.x, ==, 0.0);
      g_assert_cmpfloat (vapour.x, ==, 1.0);
      g_assert_cmpint (liquid.phase, ==, HL_PHASE_LIQUID);
      g_assert_cmpint (vapour.phase, ==, HL_PHASE_VAPOUR);
      g_assert_cmpfloat (liquid.cp, >, liquid.cv);
      g_assert_true (isfinite (vapour.w));
    }
}

static void
test_outside_the_range_fails (void)
{
  const HlFluid *water = hl_fluid_water ();
  static const struct { double a, x; } px[] = {
    { 611.0, 0.5 }, { 22.0641e6, 0.5 }, { 1e5, -0.001 }, { 1e5, 1.001 }, { NAN, 0.5 }, { 1e5, NAN }, { INFINITY, 0.5 }, { -1e5, 0.5 },
  };
  static const struct { double a, x; } Tx[] = {
    { 273.14, 0.5 }, { 647.1, 0.5 }, { 400.0, -0.001 }, { 400.0, 1.001 }, { NAN, 0.5 }, { 400.0, NAN }, { -INFINITY, 0.5 },
  };
  for (gsize i = 0; i < G_N_ELEMENTS (px); i++)
    {
      HlState state = { .h = 1.5 };
      g_assert_cmpint (hl_fluid_state_px (water, px[i].a, px[i].x, &state), ==, HL_OUTSIDE_RANGE);
      g_assert_cmpfloat (state.h, ==, 1.5);
    }
  for (gsize i = 0; i < G_N_ELEMENTS (Tx); i++)
    {
      HlState state = { .h = 1.5 };
      g_assert_cmpint (hl_fluid_state_Tx (water, Tx[i].a, Tx[i].x, &state), ==, HL_OUTSIDE_RANGE);
      g_assert_cmpfloat (state.h, ==, 1.5);
    }
  HlSaturation sat = { .T = 1.5 };
  g_assert_cmpint (hl_fluid_saturation_p (water, 600.0, &sat), ==, HL_OUTSIDE_RANGE);
  g_assert_cmpint (hl_fluid_saturation_p (water, NAN, &sat), ==, HL_OUTSIDE_RANGE);
  g_assert_cmpint (hl_fluid_saturation_T (water, 700.0, &sat), ==, HL_OUTSIDE_RANGE);
  g_assert_cmpint (hl_fluid_saturation_T (water, NAN, &sat), ==, HL_OUTSIDE_RANGE);
  g_assert_cmpfloat (sat.T, ==, 1.5);
}

int
main (int argc, char *argv[])
{
  g_test_init (&argc, &argv, NULL);
  g_test_add_func ("/fluid/water-saturation/grid", test_mixtures_agree_with_grid);
  g_test_add_func ("/fluid/water-saturation/region3", test_region3_ends_meet_the_saturation_pressure);
  g_test_add_func ("/fluid/water-saturation/critical", test_ends_draw_together_at_the_critical_point);
  g_test_add_func ("/fluid/water-saturation/slopes", test_slopes_agree_with_differences);
  g_test_add_func ("/fluid/water-saturation/clausius-clapeyron", test_clausius_clapeyron_holds);
  g_test_add_func ("/fluid/water-saturation/ends", test_ends_are_single_phase_states);
  g_test_add_func ("/fluid/water-saturation/outside", test_outside_the_range_fails);
  return g_test_run ();
}
