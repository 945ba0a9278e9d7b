/* Every state of the tables in data/fluids/ by the public calls, and fixed points of the equations.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "csv.h"
#include "fluid/helmholtz-private.h"
#include "media.h"

/* The tables have 16 digits of p, density, h and s; what remains is rounding in sums of
 * large terms, found to be 2e-12 at most.  In fourteen of the tables cp and w come from
 * differences and have nine digits. */
#define CLOSE 1e-10
#define CLOSE_SLOPE 1e-8

static void
check_row (const HlFluid *fluid, const Csv *csv, guint row)
{
  HlFluidLimits limits;
  HlState state;
  const char *phase = csv_text (csv, row, "phase");
  double T = csv_number (csv, row, "T_K"), p = csv_number (csv, row, "p_Pa"), d = csv_number (csv, row, "rho_kg_m3");
  hl_fluid_limits (fluid, &limits);
  double R = 8.3145 / limits.molar_mass;
  gboolean is_wet = strcmp (phase, "2") == 0, is_line = strcmp (phase, "sl") == 0 || strcmp (phase, "sv") == 0;
  HlStatus status;
  if (is_wet)
    status = hl_fluid_state_Tx (fluid, T, csv_number (csv, row, "x"), &state);
  else if (is_line)
    status = hl_fluid_state_Tx (fluid, T, strcmp (phase, "sv") == 0, &state);
  else
    status = hl_fluid_state_pT (fluid, p, T, &state);
  if (T > limits.T_max)
    {
      /* Beyond the published range the call refuses; the equation itself must still agree. */
      g_assert_cmpint (status, ==, HL_OUTSIDE_RANGE);
      hl_helmholtz_state (hl_helmholtz_of (fluid), d, T, &state);
    }
  else
    g_assert_cmpint (status, ==, HL_OK);
  assert_near (fluid, "p", p, T, state.p, p, CLOSE, 0.0);
  assert_near (fluid, "density", p, T, 1.0 / state.v, d, CLOSE, 0.0);
  assert_near (fluid, "h", p, T, state.h, csv_number (csv, row, "h_J_kg"), CLOSE, R * T);
  assert_near (fluid, "s", p, T, state.s, csv_number (csv, row, "s_J_kgK"), CLOSE, R);
  if (is_wet)
    {
      g_assert_cmpint (state.phase, ==, HL_PHASE_TWO_PHASE);
      g_assert_true (isnan (state.cp) && isnan (state.w));
      return;
    }
  assert_near (fluid, "cp", p, T, state.cp, csv_number (csv, row, "cp_J_kgK"), CLOSE_SLOPE, 0.0);
  assert_near (fluid, "w", p, T, state.w, csv_number (csv, row, "w_m_s"), CLOSE_SLOPE, 0.0);
}

static void
test_rows_agree (gconstpointer data)
{
  const HlFluid *fluid = hl_fluid_lookup (data);
  g_autofree char *file = g_strconcat (data, ".csv", NULL);
  g_autoptr (Csv) csv = csv_read ("fluid", "data", "fluids", file, NULL);
  g_assert_nonnull (fluid);
  for (guint i = 0; i < csv_n_rows (csv); i++)
    check_row (fluid, csv, i);
}

/* The equation itself has its inflection where the file says, and the calls answer there. */
static void
test_critical_points_answer (void)
{
  g_auto (GStrv) ids = all_media ();
  for (guint i = 0; ids[i] != NULL; i++)
    {
      const HlFluid *fluid = hl_fluid_lookup (ids[i]);
      HlFluidLimits limits;
      HlSaturation sat;
      HlState state, back;
      double p, p_d;
      hl_fluid_limits (fluid, &limits);
      hl_helmholtz_pressure (hl_helmholtz_of (fluid), 1.0 / limits.v_critical, limits.T_critical, &p, &p_d);
      assert_near (fluid, "p", p, limits.T_critical, p, limits.p_critical, 1e-9, 0.0);
      g_assert_cmpfloat (fabs (p_d), <, 1e-5 * 8.3145 / limits.molar_mass * limits.T_critical);
      g_assert_cmpint (hl_fluid_state_px (fluid, limits.p_critical, 0.0, &state), ==, HL_OK);
      assert_near (fluid, "v", p, state.T, state.v, limits.v_critical, 1e-12, 0.0);
      assert_near (fluid, "T", p, state.T, state.T, limits.T_critical, 1e-12, 0.0);
      g_assert_cmpint (hl_fluid_saturation_T (fluid, limits.T_critical, &sat), ==, HL_OK);
      g_assert_true (sat.T_p > 0.0 && isfinite (sat.T_p));
      g_assert_cmpint (hl_fluid_state_ph (fluid, limits.p_critical, state.h, &back), ==, HL_OK);
      /* The isobar is flat there: h moves as the cube of the density. */
      assert_near (fluid, "T", p, state.T, back.T, limits.T_critical, 1e-8, 0.0);
      g_assert_cmpint (hl_fluid_state_pT (fluid, limits.p_critical, limits.T_critical, &back), ==, HL_OK);
      g_assert_true (isfinite (back.h) && isfinite (back.T_p) && isfinite (back.v_h));
    }
}

int
main (int argc, char *argv[])
{
  g_test_init (&argc, &argv, NULL);
  g_auto (GStrv) ids = all_media ();
  g_assert_cmpuint (g_strv_length (ids), ==, 37);
  for (guint i = 0; ids[i] != NULL; i++)
    {
      g_autofree char *path = g_strconcat ("/fluid/helmholtz-state/rows/", ids[i], NULL);
      g_test_add_data_func (path, ids[i], test_rows_agree);
    }
  g_test_add_func ("/fluid/helmholtz-state/critical-points", test_critical_points_answer);
  return g_test_run ();
}
