/* Exergy of a steam plant against a published example.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "../engine/plants.h"
#include "../validation.h"

#define SOURCE "Moran and Shapiro, Fundamentals of Engineering Thermodynamics, 5th ed., examples 8.2, 8.8, 8.9, from memory"
#define PLANT  "Saturated steam at 8 MPa to 8 kPa, 100 MW net, dead state 22 °C"

/* Printed values rest on tables of four decimals in entropy and on T0 rounded to 295 K: what is destroyed in the turbine to 0.2 %, in the
 * condenser, a difference of two such, to 2 %.  What the steam gives up there is the sum of 11.56 MW destroyed and 2.23 MW carried away. */
static void
test_saturated_steam (void)
{
  g_autoptr (HlPlant) plant = test_plant (
    "heat_input Q1 steam.x=1 pressure_loss=0\nturbine T1 inlet.p=8e6 isentropic_efficiency=0.85 mechanical_efficiency=1\n"
    "condenser C1 steam.p=8000 subcooling=0 cooling_inlet_T=288.15 cooling_rise=20 cooling_p=101325\npump P1 isentropic_efficiency=0.85 motor_efficiency=1\n"
    "Q1.steam > T1.inlet\nT1.exhaust > C1.steam\nC1.condensate > P1.inlet\nP1.outlet > Q1.feed\nplant net_power=100e6 other_consumption_fraction=0\n");
  HlSite site = *hl_plant_site (plant);
  site.dead_T = 295.15;
  site.dead_p = 101325.0;
  g_autoptr (HlPlant) placed = hl_plant_with_site (plant, &site);
  g_autoptr (HlSolution) s = hl_solve (placed, NULL);
  test_assert_solved (s);
  validate ("Second law", PLANT, SOURCE, "exergy destroyed in the turbine", "MW", 16.72, 1e-6 * test_value (s, "T1.exergy_destruction"), 0.002 * 16.72, 4);
  validate ("Second law", PLANT, SOURCE, "exergy that the steam gives up in the condenser", "MW", 13.79, 1e-6 * test_value (s, "C1.exergy_fuel"), 0.02 * 13.79, 4);
  validate ("Second law", PLANT, SOURCE, "exergy destroyed in the condenser", "MW", 11.56, 1e-6 * test_value (s, "C1.exergy_destruction"), 0.02 * 11.56, 4);
}

int
main (int argc, char **argv)
{
  g_test_init (&argc, &argv, NULL);
  g_test_add_func ("/outside/exergy-example/saturated-steam", test_saturated_steam);
  return g_test_run ();
}
