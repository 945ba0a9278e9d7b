/* Viscosity, thermal conductivity and surface tension of water against the releases' tables.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "fluid/transport.h"

#include "csv.h"
#include "fluid/transport-private.h"
#include "media.h"

static HlState
state_dT (const HlFluid *fluid, const Csv *csv, guint row)
{
  HlState state;
  g_assert_cmpint (hl_fluid_state_dT (fluid, csv_number (csv, row, "rho[kg/m3]"), csv_number (csv, row, "T[K]"), &state), ==, HL_OK);
  return state;
}

/* IAPWS R12-08(2008), Table 4, all printed digits: the growth near the critical point set to 1. */
static void
test_viscosity_agrees_with_table4 (void)
{
  g_autoptr (Csv) csv = csv_read ("fluid", "data", "r12-08-table4.csv", NULL);
  for (guint row = 0; row < csv_n_rows (csv); row++)
    csv_assert_prints (csv, row, "mu[uPa s]",
                       hl_water_viscosity_background (csv_number (csv, row, "rho[kg/m3]"), csv_number (csv, row, "T[K]")) * 1e6, 0.5);
}

/* IAPWS R12-08(2008), Table 5, all printed digits, with IAPWS-95. */
static void
test_viscosity_agrees_with_table5 (void)
{
  const HlFluid *water = hl_fluid_lookup ("water-95");
  g_autoptr (Csv) csv = csv_read ("fluid", "data", "r12-08-table5.csv", NULL);
  for (guint row = 0; row < csv_n_rows (csv); row++)
    {
      HlState state = state_dT (water, csv, row);
      double viscosity;
      g_assert_cmpint (hl_fluid_viscosity (water, &state, &viscosity), ==, HL_OK);
      csv_assert_prints (csv, row, "mu[uPa s]", viscosity * 1e6, 0.5);
      csv_assert_prints (csv, row, "mu2[-]", viscosity / hl_water_viscosity_background (1.0 / state.v, state.T), 0.5);
    }
}

/* IAPWS R15-11(2011), Table 4, all printed digits: without the growth near the critical point. */
static void
test_conductivity_agrees_with_table4 (void)
{
  g_autoptr (Csv) csv = csv_read ("fluid", "data", "r15-11-table4.csv", NULL);
  for (guint row = 0; row < csv_n_rows (csv); row++)
    csv_assert_prints (csv, row, "lambda[mW/(m K)]",
                       hl_water_conductivity_background (csv_number (csv, row, "rho[kg/m3]"), csv_number (csv, row, "T[K]")) * 1e3, 0.5);
}

/* IAPWS R15-11(2011), Table 5, all printed digits, with IAPWS-95. */
static void
test_conductivity_agrees_with_table5 (void)
{
  const HlFluid *water = hl_fluid_lookup ("water-95");
  g_autoptr (Csv) csv = csv_read ("fluid", "data", "r15-11-table5.csv", NULL);
  for (guint row = 0; row < csv_n_rows (csv); row++)
    {
      HlState state = state_dT (water, csv, row);
      double conductivity, background = hl_water_conductivity_background (1.0 / state.v, state.T);
      g_assert_cmpint (hl_fluid_conductivity (water, &state, &conductivity), ==, HL_OK);
      csv_assert_prints (csv, row, "lambda1[-]", background / hl_water_conductivity_background (0.0, state.T), 0.5);
      csv_assert_prints (csv, row, "lambda2[-]", (conductivity - background) * 1e3, 0.5);
      csv_assert_prints (csv, row, "lambda[mW/(m K)]", conductivity * 1e3, 0.5);
    }
}

/* IAPWS R15-11(2011), Tables 7 to 9, all printed digits: the industrial form with IF97. */
static void
test_conductivity_agrees_with_tables7_to_9 (void)
{
  const HlFluid *water = hl_fluid_water ();
  g_autoptr (Csv) csv = csv_read ("fluid", "data", "r15-11-table7-9-industrial.csv", NULL);
  for (guint row = 0; row < csv_n_rows (csv); row++)
    {
      HlState state;
      double conductivity;
      if (strcmp (csv_text (csv, row, "region[-]"), "3") == 0)
        state = state_dT (water, csv, row);
      else
        g_assert_cmpint (hl_fluid_state_pT (water, csv_number (csv, row, "p[MPa]") * 1e6, csv_number (csv, row, "T[K]"), &state), ==, HL_OK);
      g_assert_cmpint (hl_fluid_conductivity (water, &state, &conductivity), ==, HL_OK);
      csv_assert_prints (csv, row, "lambda[mW/(m K)]", conductivity * 1e3, 0.5);
    }
}

/* IAPWS R1-76(2014), Table 1, rows of it; printed to 0.01 mN/m. */
static void
test_surface_tension_agrees_with_table1 (void)
{
  g_autoptr (Csv) csv = csv_read ("fluid", "data", "r1-76-table1.csv", NULL);
  for (guint row = 0; row < csv_n_rows (csv); row++)
    {
      double tension;
      g_assert_cmpint (hl_fluid_surface_tension (hl_fluid_water (), csv_number (csv, row, "t[degC]") + 273.15, &tension), ==, HL_OK);
      csv_assert_prints (csv, row, "sigma[mN/m]", tension * 1e3, 0.5);
    }
}

static void
test_refusals (void)
{
  const HlFluid *water = hl_fluid_lookup ("water-95"), *other = hl_fluid_lookup ("isopentane");
  HlState wet, hot, dense, foreign;
  double value = -1.0;
  g_assert_true (hl_fluid_has_transport (water) && hl_fluid_has_transport (hl_fluid_water ()) && !hl_fluid_has_transport (other));
  g_assert_cmpint (hl_fluid_state_px (water, 1e5, 0.5, &wet), ==, HL_OK);
  g_assert_cmpint (hl_fluid_state_pT (water, 1e5, 1200.0, &hot), ==, HL_OK);
  g_assert_cmpint (hl_fluid_state_pT (water, 400e6, 600.0, &dense), ==, HL_OK);
  g_assert_cmpint (hl_fluid_state_pT (other, 1e5, 280.0, &foreign), ==, HL_OK);
  g_assert_cmpint (hl_fluid_viscosity (water, &wet, &value), ==, HL_OUTSIDE_RANGE);
  g_assert_cmpint (hl_fluid_viscosity (water, &hot, &value), ==, HL_OUTSIDE_RANGE);
  g_assert_cmpint (hl_fluid_viscosity (water, &dense, &value), ==, HL_OUTSIDE_RANGE);
  g_assert_cmpint (hl_fluid_viscosity (other, &foreign, &value), ==, HL_OUTSIDE_RANGE);
  g_assert_cmpint (hl_fluid_conductivity (water, &wet, &value), ==, HL_OUTSIDE_RANGE);
  g_assert_cmpint (hl_fluid_conductivity (water, &dense, &value), ==, HL_OUTSIDE_RANGE);
  g_assert_cmpint (hl_fluid_conductivity (other, &foreign, &value), ==, HL_OUTSIDE_RANGE);
  g_assert_cmpint (hl_fluid_surface_tension (water, 650.0, &value), ==, HL_OUTSIDE_RANGE);
  g_assert_cmpint (hl_fluid_surface_tension (water, NAN, &value), ==, HL_OUTSIDE_RANGE);
  g_assert_cmpint (hl_fluid_surface_tension (other, 300.0, &value), ==, HL_OUTSIDE_RANGE);
  g_assert_cmpfloat (value, ==, -1.0);
}

int
main (int argc, char *argv[])
{
  g_test_init (&argc, &argv, NULL);
  g_test_add_func ("/fluid/transport/viscosity-table4", test_viscosity_agrees_with_table4);
  g_test_add_func ("/fluid/transport/viscosity-table5", test_viscosity_agrees_with_table5);
  g_test_add_func ("/fluid/transport/conductivity-table4", test_conductivity_agrees_with_table4);
  g_test_add_func ("/fluid/transport/conductivity-table5", test_conductivity_agrees_with_table5);
  g_test_add_func ("/fluid/transport/conductivity-tables7-9", test_conductivity_agrees_with_tables7_to_9);
  g_test_add_func ("/fluid/transport/surface-tension-table1", test_surface_tension_agrees_with_table1);
  g_test_add_func ("/fluid/transport/refusals", test_refusals);
  return g_test_run ();
}
