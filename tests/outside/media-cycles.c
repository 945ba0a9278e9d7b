/* Worked examples on other media than water, solved as plants and compared with the printed answers.  All of them are set down
 * from memory of the publication named; the media are by other equations there, which is why a per cent may lie between.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "plants.h"
#include "plant/circuit.h"
#include <math.h>

/* Cengel and Boles, Thermodynamics: An Engineering Approach, example 11-1 (from memory): ideal cycle with R134a between 0.14 and
 * 0.8 MPa, 0.05 kg/s: 7.18 kW taken up, 1.81 kW of work, 8.99 kW rejected, coefficient of performance 3.97. */
static void
test_ideal_refrigerator (void)
{
  g_autoptr (HlPlant) plant = test_plant (
    "evaporator EV1 source:1 superheat=0 cold_pressure_loss=0 cold_outlet.p=1.4e5 cold_outlet.m=0.05\ncompressor K1 isentropic_efficiency=1 motor_efficiency=1 outlet.p=8e5\n"
    "condenser C1 cooling:1 subcooling=0\nexpansion_valve XV1\n"
    "EV1.cold_outlet > K1.inlet\nK1.outlet > C1.steam\nC1.condensate > XV1.inlet\nXV1.outlet > EV1.cold_inlet\nmedium 1 r134a\n");
  g_autoptr (HlSolution) s = hl_solve (plant, NULL);
  test_assert_solved (s);
  test_assert_near (test_value (s, "EV1.heat"), 7.18e3, 2e-3);
  test_assert_near (test_value (s, "K1.power"), 1.81e3, 3e-3);
  test_assert_near (test_value (s, "C1.heat"), 8.99e3, 2e-3);
  test_assert_near (test_value (s, "plant.cop_cooling"), 3.97, 2e-3);
}

/* The same book, example 11-2 (from memory): R134a enters the compressor at 0.14 MPa and -10 °C, leaves it at 0.8 MPa and 50 °C, the condenser at
 * 26 °C and 0.72 MPa, is throttled to 0.15 MPa: 7.93 kW taken up, 2.02 kW of work, isentropic efficiency 0.939, coefficient of performance 3.93. */
static void
test_actual_refrigerator (void)
{
  g_autoptr (HlPlant) plant = test_plant (
    "heat_input Q1\ncompressor K1 motor_efficiency=1\nexchanger E1 counts:3\nexpansion_valve XV1 outlet.p=1.5e5\n"
    "boundary Y1 direction:0 outlet.p=2e5 outlet.T=290\nboundary Y2 direction:1 inlet.T=295\n"
    "Q1.steam > K1.inlet\nK1.outlet > E1.hot_inlet\nE1.hot_outlet > XV1.inlet\nXV1.outlet > Q1.feed\nY1.outlet > E1.cold_inlet\nE1.cold_outlet > Y2.inlet\nmedium 1 r134a\n");
  static const struct { const char *address; double value; } given[] = {
    { "K1.inlet.p", 1.4e5 }, { "K1.inlet.T", 263.15 }, { "K1.inlet.m", 0.05 }, { "K1.outlet.p", 8e5 }, { "K1.outlet.T", 323.15 },
    { "E1.hot_outlet.p", 7.2e5 }, { "E1.hot_outlet.T", 299.15 }, { "E1.cold_pressure_loss", 0.0 },
  };
  for (guint k = 0; k < G_N_ELEMENTS (given); k++)
    plant = test_plant_set (g_steal_pointer (&plant), given[k].address, given[k].value);
  g_autoptr (HlSolution) s = hl_solve (plant, NULL);
  test_assert_solved (s);
  test_assert_near (test_value (s, "Q1.heat"), 7.93e3, 2e-3);
  test_assert_near (test_value (s, "K1.power"), 2.02e3, 3e-3);
  test_assert_near (test_value (s, "K1.isentropic_efficiency"), 0.939, 3e-3);
  test_assert_near (test_value (s, "plant.cop_cooling"), 3.93, 2e-3);
}

/* Saleh, Koglbauer, Wendland and Fischer, Working fluids for low-temperature organic Rankine cycles, Energy 32 (2007) 1210 (from memory): saturated
 * vapour of 100 °C expanded with 0.85, condensed at 30 °C, pumped with 0.65; thermal efficiencies in per cent, by another equation of state (BACKONE). */
static void
test_organic_cycles_of_saleh (void)
{
  static const struct { const char *medium; double percent; } rows[] = {
    { "isobutane", 12.12 }, { "butane", 12.58 }, { "r245fa", 12.52 }, { "isopentane", 12.75 }, { "pentane", 12.91 },
  };
  for (guint k = 0; k < G_N_ELEMENTS (rows); k++)
    {
      HlSaturation hot, cold;
      const HlFluid *fluid = hl_fluid_lookup (rows[k].medium);
      g_assert_cmpint (hl_fluid_saturation_T (fluid, 373.15, &hot), ==, HL_OK);
      g_assert_cmpint (hl_fluid_saturation_T (fluid, 303.15, &cold), ==, HL_OK);
      g_autofree char *text = g_strdup_printf (
        "evaporator EV1 source:1 superheat=0 cold_pressure_loss=0 evaporation_T=373.15\nexpander TX1 exhaust.p=%.17g isentropic_efficiency=0.85 mechanical_efficiency=1\n"
        "condenser C1 cooling:1 subcooling=0\npump P1 isentropic_efficiency=0.65 motor_efficiency=1\n"
        "EV1.cold_outlet > TX1.inlet\nTX1.exhaust > C1.steam\nC1.condensate > P1.inlet\nP1.outlet > EV1.cold_inlet\nmedium 1 %s\n"
        "plant gross_power=1e6 other_consumption_fraction=0\n", cold.p, rows[k].medium);
      g_autoptr (HlPlant) plant = test_plant (text);
      g_autoptr (HlSolution) s = hl_solve (plant, NULL);
      double percent = 100.0 * test_value (s, "plant.cycle_efficiency");
      g_test_message ("%s: %.2f %%, printed %.2f %%", rows[k].medium, percent, rows[k].percent);
      test_assert_solved (s);
      /* A tenth of a point: what the two equations of state may differ by. */
      g_assert_cmpfloat (fabs (percent - rows[k].percent), <=, 0.1);
    }
}

int
main (int argc, char **argv)
{
  g_test_init (&argc, &argv, NULL);
  g_test_add_func ("/outside/media-cycles/ideal-refrigerator", test_ideal_refrigerator);
  g_test_add_func ("/outside/media-cycles/actual-refrigerator", test_actual_refrigerator);
  g_test_add_func ("/outside/media-cycles/saleh", test_organic_cycles_of_saleh);
  return g_test_run ();
}
