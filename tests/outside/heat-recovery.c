/* A heat-recovery boiler by pinch and approach, solved as a plant and compared with the answers of its author.
 * V. Ganapathy: Heat-Recovery Steam Generators: Understand the Basics, Chem. Eng. Prog. 92 (August 1996) 32-45, the example of the
 * text, set down from memory: 140,000 lb/h of turbine exhaust at 980 °F (by volume CO2 3, H2O 7, N2 75, O2 15 %), saturated steam at
 * 200 psig, feed of 230 °F, blowdown 5 % of the steam, pinch 20 °F, approach 15 °F, heat loss 1 %.  The author takes the gas at a mean
 * heat capacity of 0.27 Btu/(lb °F) in the evaporator and 0.253 in the economiser; here its enthalpy comes from its composition, so
 * a difference of 1.5 % is what that simplification is worth.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "plants.h"
#include "validation.h"
#include <math.h>

#define LB_H (0.45359237 / 3600.0)
#define BTU_H (1055.05585262 / 3600.0)

static double fahrenheit (double T_K) { return T_K * 1.8 - 459.67; }

typedef struct { const char *what, *unit; double published, ours, part; int digits; } Row;

static void
test_saturated_steam_by_pinch_and_approach (void)
{
  g_autofree char *text = g_strdup_printf (
    "gas_source HG1 outlet.m=%.10g outlet.T=%.10g\n"
    "evaporator_drum ED1 blowdown:1 blowdown_fraction=%.10g pinch=%.10g steam.p=%.10g gas_pressure_loss=0 heat_loss_fraction=0.01\n"
    "economiser EC1 approach=%.10g pressure_loss=0 gas_pressure_loss=0 heat_loss_fraction=0.01\nstack ST1 inlet.p=101325\n"
    "boundary Y1 direction:0 outlet.T=%.10g\nboundary Y2 direction:1\nboundary Y3 direction:1\n"
    "HG1.outlet > ED1.gas_inlet\nED1.gas_outlet > EC1.gas_inlet\nEC1.gas_outlet > ST1.inlet\n"
    "Y1.outlet > EC1.inlet\nEC1.outlet > ED1.feed\nED1.steam > Y2.inlet\nED1.blowdown > Y3.inlet\nmedium 1 gas:CO2=0.03,H2O=0.07,N2=0.75,O2=0.15\n",
    140e3 * LB_H, (980.0 + 459.67) / 1.8, 0.05 / 1.05, 20.0 / 1.8, 214.696 * 6894.757293168, 15.0 / 1.8, (230.0 + 459.67) / 1.8);
  g_autoptr (HlPlant) plant = test_plant (text);
  g_autoptr (HlSolution) s = hl_solve (plant, NULL);
  double mass, energy;
  test_assert_solved (s);
  hl_solution_balances (s, &mass, &energy);
  g_assert_cmpfloat (fabs (mass), <, 1e-9);
  g_assert_cmpfloat (fabs (energy), <, 1e-9);
  const Row rows[] = {
    { "saturation temperature", "°F", 388.0, fahrenheit (test_value (s, "ED1.steam.T")), 1e-3, 4 },
    { "gas behind the evaporator", "°F", 408.0, fahrenheit (test_value (s, "ED1.gas_outlet.T")), 1e-3, 4 },
    { "water behind the economiser", "°F", 373.0, fahrenheit (test_value (s, "EC1.outlet.T")), 1e-3, 4 },
    { "heat of the evaporator", "MMBtu/h", 21.4, test_value (s, "ED1.heat") / BTU_H / 1e6, 0.015, 3 },
    { "steam", "lb/h", 25000.0, test_value (s, "ED1.steam.m") / LB_H, 0.015, 5 },
    { "heat of the economiser", "MMBtu/h", 3.84, test_value (s, "EC1.heat") / BTU_H / 1e6, 0.015, 3 },
    { "gas at the stack", "°F", 299.0, fahrenheit (test_value (s, "ST1.inlet.T")), 0.015, 4 },
  };
  for (guint k = 0; k < G_N_ELEMENTS (rows); k++)
    validate ("Heat-recovery boiler", "saturated steam by pinch and approach",
              "V. Ganapathy: Heat-Recovery Steam Generators: Understand the Basics, Chem. Eng. Prog. 92 (August 1996) 32-45, from memory",
              rows[k].what, rows[k].unit, rows[k].published, rows[k].ours, rows[k].part * rows[k].published, rows[k].digits);
}

int
main (int argc, char **argv)
{
  g_test_init (&argc, &argv, NULL);
  g_test_add_func ("/outside/heat-recovery/saturated-steam-by-pinch-and-approach", test_saturated_steam_by_pinch_and_approach);
  return g_test_run ();
}
