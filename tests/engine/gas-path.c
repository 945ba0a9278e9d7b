/* Heating surfaces on a gas path, its source, fan and stack: against hand calculations, both ways, and findings.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "laws.h"
#include "fluid/gas.h"
#include <math.h>
#include <string.h>

#define LOSSES " gas_pressure_loss=0.005 heat_loss_fraction=0.01 "

/* One pressure level in counterflow: superheater, evaporator, economiser, stack.  Streams 1 to 4 are the gas. */
#define BOILER(source, superheater, evaporator, economiser, stack) \
  "gas_source HG1 outlet.m=50 outlet.T=823.15 " source "\n" \
  "superheater SH1 pressure_loss=0.04" LOSSES superheater "\nevaporator_drum ED1" LOSSES evaporator "\neconomiser EC1 pressure_loss=0.02" LOSSES economiser "\n" \
  "stack ST1 " stack "\nboundary Y1 direction:0 outlet.T=378.15\nboundary Y2 direction:1 inlet.p=40e5\n" \
  "HG1.outlet > SH1.gas_inlet\nSH1.gas_outlet > ED1.gas_inlet\nED1.gas_outlet > EC1.gas_inlet\nEC1.gas_outlet > ST1.inlet\n" \
  "Y1.outlet > EC1.inlet\nEC1.outlet > ED1.feed\nED1.steam > SH1.inlet\nSH1.outlet > Y2.inlet\n"
#define GAS "medium 1 flue-gas\n"
#define USUAL BOILER ("", "hot_end_difference=30", "pinch=10", "approach=8", "inlet.p=101325") GAS

static const HlFluid *gas (void) { return hl_fluid_lookup ("flue-gas"); }

static double
h_of (const HlFluid *fluid, double p, double T)
{
  HlState st;
  g_assert_cmpint (hl_fluid_state_pT (fluid, p, T, &st), ==, HL_OK);
  return st.h;
}

/* From the hot end to the pinch the gas, less 1 %, boils and superheats; below it the feed takes what is left. */
static void
test_one_level_by_hand (void)
{
  g_autoptr (HlPlant) plant = test_plant (USUAL);
  g_autoptr (HlSolution) s = hl_solve (plant, NULL);
  HlSaturation drum;
  test_assert_solved (s);
  test_assert_balanced (s);
  const HlFluid *water = hl_fluid_water ();
  double p = 40e5 / 0.96, p_gas = test_value (s, "HG1.outlet.p");
  test_assert_near (p_gas, 101325.0 / pow (0.995, 3), 1e-10);
  g_assert_cmpint (hl_fluid_saturation_p (water, p, &drum), ==, HL_OK);
  double h_feed = h_of (water, p, drum.T - 8.0), h_steam = h_of (water, 40e5, 793.15);
  double given = 0.99 * 50.0 * (h_of (gas (), p_gas, 823.15) - h_of (gas (), p_gas, drum.T + 10.0)), m = given / (h_steam - h_feed);
  test_assert_near (test_value (s, "ED1.steam.m"), m, 1e-9);
  double eco = m * (h_feed - h_of (water, p / 0.98, 378.15)), h_stack = h_of (gas (), p_gas, drum.T + 10.0) - eco / 0.99 / 50.0;
  test_assert_near (test_value (s, "EC1.heat"), eco, 1e-9);
  g_assert_cmpfloat (fabs (test_value (s, "ST1.inlet.h") - h_stack), <, 1e-6 * 1e6);
  /* What the gas brings is what arrives, what is lost, and what the stack takes: all above 25 °C. */
  double sum = test_value (s, "plant.heat_input") + test_value (s, "ST1.heat") + test_value (s, "SH1.heat_loss") + test_value (s, "ED1.heat_loss") + test_value (s, "EC1.heat_loss");
  test_assert_near (test_value (s, "HG1.heat"), sum, 1e-9);
  test_assert_near (test_value (s, "HG1.heat"), 50.0 * (h_of (gas (), p_gas, 823.15) - hl_gas_zero_enthalpy (gas ())), 1e-9);
  g_assert_cmpfloat (test_value (s, "ST1.inlet.T"), >, 430.0);
  g_assert_cmpfloat (test_value (s, "ST1.inlet.T"), <, 460.0);
}

/* UA of the evaporator against the midpoint rule over a thousand parts of its gas. */
static void
test_evaporator_conductance (void)
{
  g_autoptr (HlPlant) plant = test_plant (USUAL);
  g_autoptr (HlSolution) s = hl_solve (plant, NULL);
  HlSaturation drum;
  test_assert_solved (s);
  g_assert_cmpint (hl_fluid_saturation_p (hl_fluid_water (), test_value (s, "ED1.steam.p"), &drum), ==, HL_OK);
  double h1 = test_value (s, "ED1.gas_inlet.h"), h0 = test_value (s, "ED1.gas_outlet.h"), p = test_value (s, "ED1.gas_outlet.p"), sum = 0.0;
  for (int k = 0; k < 1000; k++)
    {
      HlState st;
      g_assert_cmpint (hl_fluid_state_ph (gas (), p, h0 + (k + 0.5) / 1000.0 * (h1 - h0), &st), ==, HL_OK);
      sum += 1e-3 / (st.T - drum.T);
    }
  test_assert_near (test_value (s, "ED1.UA"), test_value (s, "ED1.heat") * sum, 1e-4);
  test_assert_near (test_value (s, "ED1.pinch"), 10.0, 1e-9);
  /* The heat diagram shows the surface: all its heat at the temperature of the drum, so that its pinch is that of the table. */
  double shown = 0.0;
  for (guint k = 0; k < hl_solution_n_processes (s); k++)
    {
      const HlProcess *process = hl_solution_process (s, k);
      if (process->kind != HL_PROCESS_HEATING || !g_str_equal (hl_plant_component (plant, process->component)->id, "ED1"))
        continue;
      test_assert_near (process->from.T, drum.T, 1e-9);
      shown += process->m * (process->to.h - process->from.h);
    }
  test_assert_near (shown, test_value (s, "ED1.heat"), 1e-9);
}

static void
test_any_of_them_may_be_given (void)
{
  g_assert_cmpuint (test_give_each (USUAL), >, 25);
}

/* Blowdown, and a furnace gas stood in for by nitrogen: the gas is whatever its stream carries. */
#define OTHER BOILER ("", "outlet.T=700", "blowdown:1 blowdown_fraction=0.03 UA=60e3", "UA=30e3", "inlet.p=101325") \
  "boundary Y3 direction:1\nED1.blowdown > Y3.inlet\nmedium 1 nitrogen\n"

static void
test_sizes_given_on_another_gas (void)
{
  g_autoptr (HlPlant) plant = test_plant (OTHER);
  g_autoptr (HlSolution) s = hl_solve (plant, NULL);
  test_assert_solved (s);
  test_assert_balanced (s);
  test_assert_near (test_value (s, "ED1.blowdown.m"), 0.03 * test_value (s, "EC1.inlet.m"), 1e-9);
  test_assert_near (test_value (s, "ED1.UA"), 60e3, 1e-9);
  g_assert_cmpfloat (test_value (s, "ED1.pinch"), >, 0.0);
}

/* Fan: isentropic head over the efficiency; air of 1 bar as a gas of nearly constant heat capacity. */
#define AIR \
  "boundary Y1 direction:0 outlet.p=101325 outlet.T=288.15 outlet.m=20\nfan F1 pressure_rise=4000 isentropic_efficiency=0.7 motor_efficiency=0.95\n" \
  "steam_air_heater SA1 air_pressure_loss=0.005 drain_subcooling=0 terminal_difference=40\nboundary Y4 direction:0 outlet.p=4e5 outlet.T=440\nboundary Y5 direction:1\n" \
  "air_preheater AH1 pressure_loss=0.008 gas_pressure_loss=0.008 heat_loss_fraction=0.01 hot_end_difference=60\n" \
  "gas_source HG1 outlet.m=21 outlet.T=600\nstack ST1 gas:1 so3_fraction=10e-6 inlet.p=101325\nboundary Y3 direction:1\n" \
  "Y1.outlet > F1.inlet\nF1.outlet > SA1.air_inlet\nSA1.air_outlet > AH1.air_inlet\nAH1.air_outlet > Y3.inlet\n" \
  "HG1.outlet > AH1.gas_inlet\nAH1.gas_outlet > ST1.inlet\nY4.outlet > SA1.steam\nSA1.drain > Y5.inlet\nmedium 1 air\nmedium 5 flue-gas\n"

static void
test_air_side_by_hand (void)
{
  g_autoptr (HlPlant) plant = test_plant (AIR);
  g_autoptr (HlSolution) s = hl_solve (plant, NULL);
  HlSaturation steam;
  test_assert_solved (s);
  test_assert_balanced (s);
  const double kappa = 0.2857;
  double rise = 288.15 * (pow (105325.0 / 101325.0, kappa) - 1.0) / 0.7;
  test_assert_near (test_value (s, "F1.temperature_rise"), rise, 2e-3);
  test_assert_near (test_value (s, "F1.power"), 20.0 * 1004.0 * rise, 5e-3);
  test_assert_near (test_value (s, "F1.motor_power"), test_value (s, "F1.power") / 0.95, 1e-12);
  g_assert_cmpint (hl_fluid_saturation_p (hl_fluid_water (), 4e5, &steam), ==, HL_OK);
  test_assert_near (test_value (s, "SA1.air_outlet.T"), steam.T - 40.0, 1e-9);
  test_assert_near (test_value (s, "SA1.drain.h"), steam.h_liquid, 1e-9);
  test_assert_near (test_value (s, "AH1.air_outlet.T"), 540.0, 1e-9);
  double given = 21.0 * (test_value (s, "AH1.gas_inlet.h") - test_value (s, "AH1.gas_outlet.h"));
  test_assert_near (test_value (s, "AH1.heat"), 0.99 * given, 1e-9);
}

/* Verhoff and Banchero 1974, the example that their formula is quoted with: 38.11 mmHg of water, 9.7421e-4 mmHg of SO3: 110.5 °C
 * printed, 110.4 °C by the formula; here with a gas of 5 % water at such a pressure. */
static void
test_dew_points (void)
{
  const double p = 38.11 * 133.3224 / 0.05;
  g_autofree char *text = g_strdup_printf ("gas_source HG1 outlet.m=1 outlet.T=500\nstack ST1 gas:1 inlet.p=%.10g so3_fraction=%.10g\nHG1.outlet > ST1.inlet\n"
    "medium 1 gas:N2=0.80,CO2=0.10,H2O=0.05,O2=0.05\n", p, 9.7421e-4 * 133.3224 / p);
  g_autoptr (HlPlant) plant = test_plant (text);
  g_autoptr (HlSolution) s = hl_solve (plant, NULL);
  HlSaturation sat;
  test_assert_solved (s);
  g_assert_cmpfloat (fabs (test_value (s, "ST1.acid_dew_point") - 273.15 - 110.45), <, 0.1);
  g_assert_cmpint (hl_fluid_saturation_p (hl_fluid_water (), 38.11 * 133.3224, &sat), ==, HL_OK);
  test_assert_near (test_value (s, "ST1.water_dew_point"), sat.T, 1e-9);
}

/* Gas with 12 % water cooled to 45 °C: what the saturated rest cannot hold drips. */
#define CONDENSER(words) \
  "gas_source HG1 outlet.m=10 outlet.T=420\nflue_gas_condenser FC1 serves:1 pressure_loss=0.02" LOSSES words "\nstack ST1 inlet.p=101325\n" \
  "boundary Y1 direction:0 outlet.p=5e5 outlet.T=308.15 outlet.m=40\nboundary Y2 direction:1\n" \
  "HG1.outlet > FC1.gas_inlet\nFC1.gas_outlet > ST1.inlet\nY1.outlet > FC1.inlet\nFC1.outlet > Y2.inlet\nmedium 1 gas:N2=0.72,CO2=0.10,H2O=0.12,O2=0.06\n"

static void
test_flue_gas_condenses (void)
{
  g_autoptr (HlPlant) plant = test_plant (CONDENSER ("gas_outlet.T=318.15"));
  g_autoptr (HlSolution) s = hl_solve (plant, NULL);
  HlSaturation sat;
  test_assert_solved (s);
  test_assert_balanced (s);
  g_assert_cmpint (hl_fluid_saturation_T (hl_fluid_water (), 318.15, &sat), ==, HL_OK);
  const double M = 0.72 * 0.0280134 + 0.10 * 0.0440095 + 0.12 * 0.0180153 + 0.06 * 0.0319988;
  double left = 0.88 * sat.p / (101325.0 - sat.p), expected = 10.0 / M * (0.12 - left) * 0.0180153;
  test_assert_near (test_value (s, "FC1.condensate_flow"), expected, 1e-4);
  test_assert_near (test_value (s, "plant.heat_delivered"), test_value (s, "FC1.heat"), 1e-12);
  /* Gas of 1.09 kJ/(kg K), and 2.4 MJ for a kilogram that condenses. */
  test_assert_near (test_value (s, "FC1.heat") / 0.99, 10.0 * 1090.0 * (420.0 - 318.15) + 2.4e6 * expected, 2e-2);
}

#define SUN "boundary Y1 direction:0 outlet.p=20e5 outlet.T=330 outlet.m=8\nboundary Y2 direction:1\n" \
  "solar_field SF1 outlet.T=440 irradiance=800 efficiency=0.6 pressure_loss=0.2\nY1.outlet > SF1.inlet\nSF1.outlet > Y2.inlet\n"

static void
test_solar_field (void)
{
  g_autoptr (HlPlant) plant = test_plant (SUN);
  g_autoptr (HlSolution) s = hl_solve (plant, NULL);
  test_assert_solved (s);
  test_assert_balanced (s);
  double heat = 8.0 * (h_of (hl_fluid_water (), 16e5, 440.0) - h_of (hl_fluid_water (), 20e5, 330.0));
  test_assert_near (test_value (s, "SF1.aperture"), heat / 480.0, 1e-9);
  test_assert_near (test_value (s, "plant.heat_input"), heat, 1e-9);
  g_assert_cmpuint (test_give_each (SUN), >, 2);
}

static void
test_derivatives (void)
{
  test_check_derivatives (USUAL);
  test_check_derivatives (OTHER);
  test_check_derivatives (AIR);
  test_check_derivatives (CONDENSER ("gas_outlet.T=318.15"));
  test_check_derivatives (SUN);
}

static void
test_findings (void)
{
  test_expect_finding (BOILER ("", "hot_end_difference=30", "pinch=4", "approach=8", "inlet.p=101325") GAS, "small-pinch", HL_GRADE_CAUTION,
    "The pinch of ED1 is 4.0 K; for gas of ");
  test_expect_finding (BOILER ("", "hot_end_difference=30", "pinch=4", "approach=8", "inlet.p=101325") GAS, "small-pinch", HL_GRADE_CAUTION,
    " common are 6.0 K to 17.0 K (V. Ganapathy). Less asks for a very large surface.");
  test_expect_finding (BOILER ("", "hot_end_difference=30", "pinch=30", "approach=8", "inlet.p=101325") GAS, "large-pinch", HL_GRADE_HINT,
    " common are 6.0 K to 17.0 K (V. Ganapathy). More leaves heat in the gas.");
  test_expect_finding (BOILER ("", "hot_end_difference=30", "tubes:1 pinch=10", "approach=8", "inlet.p=101325") GAS, "small-pinch", HL_GRADE_CAUTION,
    " common are 44.0 K to 72.0 K (V. Ganapathy).");
  test_expect_finding (BOILER ("", "hot_end_difference=12", "pinch=10", "approach=8", "inlet.p=101325") GAS, "superheater-difference", HL_GRADE_CAUTION,
    "Steam of SH1 leaves only 12.0 K below the gas that comes in; common are 20 to 60 K. Lower the steam temperature.");
  test_expect_finding (BOILER ("", "hot_end_difference=-5", "pinch=10", "approach=8", "inlet.p=101325") GAS, "temperature-cross", HL_GRADE_ERROR,
    "In SH1 the cold side would be 5.0 K hotter than the hot side");
  test_expect_finding (BOILER ("", "hot_end_difference=30", "pinch=-5", "approach=8", "inlet.p=101325") GAS, "temperature-cross", HL_GRADE_ERROR,
    "ED1 boils at 252.8 °C, but its gas comes at 466.4 °C and would leave at 247.8 °C. Lower the pressure, let less heat pass, or bring hotter gas.");
  /* More gas heat in the economiser than its water can take as liquid. */
  test_expect_finding (BOILER ("", "hot_end_difference=30", "pinch=10", "gas_outlet.T=400", "inlet.p=101325") GAS, "steaming-economiser", HL_GRADE_CAUTION,
    "EC1 steams: ");
  test_expect_finding (BOILER ("", "hot_end_difference=30", "pinch=10", "gas_outlet.T=400", "inlet.p=101325") GAS, "drum-feed-steams", HL_GRADE_HINT,
    "The feed of ED1 reaches the drum partly as steam.");
}

/* Gas that goes straight to the stack. */
#define STACK(T, words) "gas_source HG1 outlet.m=1 outlet.T=" T "\nstack ST1 inlet.p=101325 " words "\nHG1.outlet > ST1.inlet\nmedium 1 gas:N2=0.70,CO2=0.12,H2O=0.12,O2=0.06\n"

static void
test_stack_findings (void)
{
  test_expect_finding (STACK ("405", "gas:1 so3_fraction=10e-6"), "below-acid-dew-point", HL_GRADE_CAUTION, "Gas reaches stack ST1 at 131.9 °C, less than 10 K above its acid dew point, ");
  test_expect_finding (STACK ("420", "gas:1 so3_fraction=1e-6"), "cold-stack", HL_GRADE_HINT,
    "Gas reaches stack ST1 at 146.9 °C; common are 150.0 °C and more, for draught and against corrosion.");
  test_expect_finding (STACK ("355", "gas:0"), "cold-stack", HL_GRADE_HINT, "Gas reaches stack ST1 at 81.9 °C; common are 90.0 °C and more, for draught and against corrosion.");
  test_expect_finding (STACK ("315", "gas:0"), "below-water-dew-point", HL_GRADE_CAUTION, "Gas reaches stack ST1 at 41.9 °C, below the dew point of its water, ");
  test_expect_finding (CONDENSER ("gas_outlet.T=360"), "nothing-condenses", HL_GRADE_HINT,
    "Nothing condenses in FC1: its gas leaves above the dew point. Cool it further, with colder water.");
  test_expect_finding ("boundary Y1 direction:0 outlet.p=2e5 outlet.T=300 outlet.m=1\nboundary Y2 direction:1\nfan F1 isentropic_efficiency=0.7 motor_efficiency=0.95 pressure_rise=1000\n"
    "Y1.outlet > F1.inlet\nF1.outlet > Y2.inlet\n", "fan-liquid", HL_GRADE_ERROR, "Fan F1 draws liquid: it moves gas.");
}

int
main (int argc, char **argv)
{
  g_test_init (&argc, &argv, NULL);
  g_test_add_func ("/engine/gas-path/one-level-by-hand", test_one_level_by_hand);
  g_test_add_func ("/engine/gas-path/evaporator-conductance", test_evaporator_conductance);
  g_test_add_func ("/engine/gas-path/any-of-them-may-be-given", test_any_of_them_may_be_given);
  g_test_add_func ("/engine/gas-path/sizes-given-on-another-gas", test_sizes_given_on_another_gas);
  g_test_add_func ("/engine/gas-path/air-side-by-hand", test_air_side_by_hand);
  g_test_add_func ("/engine/gas-path/dew-points", test_dew_points);
  g_test_add_func ("/engine/gas-path/flue-gas-condenses", test_flue_gas_condenses);
  g_test_add_func ("/engine/gas-path/solar-field", test_solar_field);
  g_test_add_func ("/engine/gas-path/derivatives", test_derivatives);
  g_test_add_func ("/engine/gas-path/findings", test_findings);
  g_test_add_func ("/engine/gas-path/stack-findings", test_stack_findings);
  return g_test_run ();
}
