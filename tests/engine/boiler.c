/* Fired boiler: blowdown, fuels, efficiency by losses, CO2, against hand calculations, both ways, and findings.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "laws.h"
#include <math.h>
#include <string.h>

/* Water at 100 bar and 180 °C to steam of 92 bar and 500 °C. */
#define BOILER(words) \
  "boundary Y1 direction:0 outlet.p=100e5 outlet.T=453.15\nboundary Y2 direction:1\n" \
  "boiler B1 steam.T=773.15 pressure_loss=0.08 " words "\nY1.outlet > B1.feed\nB1.steam > Y2.inlet\n"
#define WITH_DRUM(words) BOILER ("blowdown:1 blowdown_fraction=0.02 economiser_pressure_loss=0.03 " words) "boundary Y3 direction:1\nB1.blowdown > Y3.inlet\n"

static double
h_pT (double p, double T)
{
  HlState st;
  g_assert_cmpint (hl_fluid_state_pT (hl_fluid_water (), p, T, &st), ==, HL_OK);
  return st.h;
}

/* Of 20 kg/s of feed 0.4 leave as saturated water of the drum, at 97 bar. */
static void
test_blowdown_by_hand (void)
{
  g_autoptr (HlPlant) plant = test_plant (WITH_DRUM ("feed.m=20 efficiency=0.9 fuel_lhv=20e6 fuel_hhv_ratio=1.1"));
  g_autoptr (HlSolution) s = hl_solve (plant, NULL);
  HlSaturation drum;
  test_assert_solved (s);
  test_assert_balanced (s);
  g_assert_cmpint (hl_fluid_saturation_p (hl_fluid_water (), 97e5, &drum), ==, HL_OK);
  double heat = 19.6 * h_pT (92e5, 773.15) + 0.4 * drum.h_liquid - 20.0 * h_pT (100e5, 453.15);
  test_assert_near (test_value (s, "B1.blowdown.m"), 0.4, 1e-12);
  test_assert_near (test_value (s, "B1.blowdown.T"), drum.T, 1e-12);
  test_assert_near (test_value (s, "B1.heat"), heat, 1e-10);
  test_assert_near (test_value (s, "B1.fuel_flow"), heat / 0.9 / 20e6, 1e-10);
  /* In the heat diagram the two ways add up to all the heat. */
  double sum = 0.0;
  for (guint k = 0; k < hl_solution_n_processes (s); k++)
    sum += hl_solution_process (s, k)->m * (hl_solution_process (s, k)->to.h - hl_solution_process (s, k)->from.h);
  test_assert_near (sum, heat, 1e-10);
}

/* Natural gas, 120 °C, 15 % excess air: O2 = 0.21 x 0.15 / 1.15; Siegert: 105 K x (0.66 x 1.15 / 21 + 0.009) = 4.74 %;
 * EN 12952-15: 0.0113 Q^0.7; the rest by Q_fuel (1 - q) = Q + Q_rc. */
static void
test_losses_by_hand (void)
{
  g_autoptr (HlPlant) plant = test_plant (BOILER ("feed.m=20 fuel:1 efficiency_by:1 flue_gas_T=393.15 excess_air=0.15 dry_gas_constant=0.66 "
    "wet_gas_constant=0.009 unburned_fraction=0.002 radiation_coefficient=0.0113 fuel_lhv=48e6 fuel_hhv_ratio=1.11 co2_factor=56.1e-9 biogenic_co2_factor=0"));
  g_autoptr (HlSolution) s = hl_solve (plant, NULL);
  test_assert_solved (s);
  double heat = 20.0 * (h_pT (92e5, 773.15) - h_pT (100e5, 453.15)), q = 105.0 * (0.66 * 1.15 / 21.0 + 0.009) / 100.0;
  double walls = 0.0113e6 * pow (heat / 1e6, 0.7), fuel = (heat + walls) / (1.0 - q - 0.002);
  g_assert_cmpfloat (fabs (hl_plant_site (plant)->ambient_T - 288.15), <, 1e-9);
  test_assert_near (q, 0.0474, 1e-3);
  test_assert_near (test_value (s, "B1.flue_gas_oxygen"), 0.21 * 0.15 / 1.15, 1e-12);
  test_assert_near (test_value (s, "B1.radiation_loss"), walls, 1e-9);
  test_assert_near (test_value (s, "B1.fuel_heat"), fuel, 1e-9);
  test_assert_near (test_value (s, "B1.efficiency"), heat / fuel, 1e-9);
  test_assert_near (test_value (s, "B1.stack_loss"), q * fuel, 1e-9);
  test_assert_near (test_value (s, "B1.fuel_heat_hhv"), 1.11 * fuel, 1e-9);
  test_assert_near (test_value (s, "B1.co2_flow"), 56.1e-9 * fuel, 1e-9);
  test_assert_near (test_value (s, "plant.co2_flow"), 56.1e-9 * fuel, 1e-9);
  g_assert_cmpfloat (fabs (test_value (s, "plant.biogenic_co2_flow")), <, 1e-12);
}

/* An assumed efficiency goes where the losses are to make it, and comes back; so do the values of a fuel. */
static void
test_options_bring_their_values (void)
{
  g_autoptr (HlComponent) boiler = hl_component_new (hl_kind_lookup ("boiler"), "B1", 0, 0);
  const HlQuantityKind *lhv = hl_component_quantity_kind (boiler, "fuel_lhv");
  g_assert_cmpfloat (hl_values_find (&boiler->values, "efficiency")->value, ==, 0.90);
  g_assert_null (hl_component_quantity_kind (boiler, "co2_factor"));
  hl_component_set_option (boiler, "fuel", 8);
  g_assert_cmpfloat (hl_values_find (&boiler->values, "fuel_lhv")->value, ==, 15.6e6);
  g_assert_cmpfloat (hl_values_find (&boiler->values, "efficiency")->value, ==, 0.87);
  g_assert_cmpfloat (hl_values_find (&boiler->values, "co2_factor")->value, ==, 0.0);
  g_assert_cmpfloat (hl_values_find (&boiler->values, "biogenic_co2_factor")->value, ==, 112.0e-9);
  g_assert_nonnull (strstr (hl_component_default_source (boiler, lhv), "IPCC 2006"));
  /* What was typed stays. */
  HlValue typed = { .origin = HL_ORIGIN_GIVEN, .value = 9.08e6 };
  hl_component_set_value (boiler, "fuel_lhv", &typed);
  hl_component_set_option (boiler, "fuel", 5);
  g_assert_cmpfloat (hl_values_find (&boiler->values, "fuel_lhv")->value, ==, 9.08e6);
  g_assert_cmpfloat (hl_values_find (&boiler->values, "co2_factor")->value, ==, 94.6e-9);
  hl_component_set_option (boiler, "efficiency_by", 1);
  g_assert_null (hl_values_find (&boiler->values, "efficiency"));
  g_assert_cmpfloat (hl_values_find (&boiler->values, "radiation_coefficient")->value, ==, 0.0220);
  hl_component_set_option (boiler, "efficiency_by", 0);
  g_assert_cmpfloat (hl_values_find (&boiler->values, "efficiency")->value, ==, 0.90);
  g_assert_null (hl_values_find (&boiler->values, "radiation_coefficient"));
}

/* Every fuel lies within the ranges of its rows, and all of them have a source. */
static void
test_fuels_are_credible (void)
{
  const HlKind *kind = hl_kind_lookup ("boiler");
  g_autoptr (HlComponent) boiler = hl_component_new (kind, "B1", 0, 0);
  hl_component_set_option (boiler, "efficiency_by", 1);
  for (int fuel = 1; fuel <= kind->options[hl_kind_find_option (kind, "fuel")].most; fuel++)
    {
      hl_component_set_option (boiler, "fuel", fuel);
      for (guint k = 0; k < hl_component_n_quantities (boiler); k++)
        {
          const HlQuantityKind *q = hl_component_quantity (boiler, k).kind;
          double value = hl_component_default (boiler, q, 0);
          if (q->default_option == NULL)
            continue;
          g_test_message ("%d %s %g", fuel, q->key, value);
          g_assert_cmpfloat (value, >=, q->credible_low);
          g_assert_cmpfloat (value, <=, q->credible_high);
          g_assert_cmpuint (strlen (hl_component_default_source (boiler, q)), >, 10);
        }
      /* HHV - LHV of less than 3.5 MJ/kg of hydrogen and water, but for gas. */
      double lhv = hl_values_find (&boiler->values, "fuel_lhv")->value, ratio = hl_values_find (&boiler->values, "fuel_hhv_ratio")->value;
      g_assert_cmpfloat (lhv * (ratio - 1.0), <, fuel == 1 ? 5.5e6 : 3.5e6);
    }
}

#define STATION(boiler) \
  "boiler B1 steam.T=758.15 pressure_loss=0.08 " boiler "\n" \
  "turbine T1 inlet.p=65e5 exhaust.p=7000 isentropic_efficiency=0.83 mechanical_efficiency=0.985\ngenerator G1 efficiency=0.98\n" \
  "condenser C1 cooling:1 subcooling=0\npump P1 isentropic_efficiency=0.75 motor_efficiency=0.95\n" \
  "open_heater D1 inlets:1 steam.p=2e5 outlet_subcooling=0\nmake_up W1 outlet.T=288.15\npump P2 isentropic_efficiency=0.75 motor_efficiency=0.95\n" \
  "mixer M1\nboundary Y3 direction:1\nsplitter X1\nvalve V1\n" \
  "B1.steam > X1.inlet\nX1.outlet1 > T1.inlet\nX1.outlet2 > V1.inlet\nV1.outlet > D1.steam\nT1.exhaust > C1.steam\nC1.condensate > P1.inlet\n" \
  "P1.outlet > M1.inlet1\nW1.outlet > M1.inlet2\nM1.outlet > D1.inlet1\nD1.outlet > P2.inlet\nP2.outlet > B1.feed\nB1.blowdown > Y3.inlet\n" \
  "shaft T1 G1\nplant net_power=12e6 other_consumption_fraction=0\n"
#define FULL STATION ("blowdown:1 fuel:8 efficiency_by:1 blowdown_fraction=0.01 economiser_pressure_loss=0.025 flue_gas_T=420 excess_air=0.35 " \
  "dry_gas_constant=0.71 wet_gas_constant=0.007 unburned_fraction=0.01 radiation_coefficient=0.0315 fuel_lhv=15.6e6 fuel_hhv_ratio=1.093 " \
  "co2_factor=1e-9 biogenic_co2_factor=112e-9")

static void
test_in_a_plant (void)
{
  g_autoptr (HlPlant) plant = test_plant (FULL);
  g_autoptr (HlSolution) s = hl_solve (plant, NULL);
  test_assert_solved (s);
  test_assert_balanced (s);
  test_assert_near (test_value (s, "W1.outlet.m"), test_value (s, "B1.blowdown.m"), 1e-9);
  test_assert_near (test_value (s, "plant.specific_co2"), test_value (s, "plant.co2_flow") / 12e6, 1e-9);
  test_assert_near (test_value (s, "plant.net_efficiency_hhv"), test_value (s, "plant.net_efficiency_lhv") / 1.093, 1e-9);
  g_assert_cmpuint (test_give_each (FULL), >, 20);
}

/* Give the efficiency, and the flue gas temperature is what yields. */
static void
test_efficiency_given_finds_the_flue_gas (void)
{
  g_autoptr (HlPlant) plant = test_plant (BOILER ("feed.m=20 fuel:1 efficiency_by:1 ~flue_gas_T=393.15 ~excess_air=0.15 ~dry_gas_constant=0.66 "
    "~wet_gas_constant=0.009 ~unburned_fraction=0 ~radiation_coefficient=0.0113 ~fuel_lhv=48e6 ~fuel_hhv_ratio=1.11 ~co2_factor=56.1e-9 ~biogenic_co2_factor=0"));
  HlAddress efficiency = hl_address_component (g_intern_static_string ("B1"), g_intern_static_string ("efficiency"));
  plant = test_plant_set (plant, "B1.efficiency", 0.92);
  GArray *yielded;
  g_autoptr (HlPlant) settled = hl_settle (plant, &efficiency, &yielded);
  g_assert_cmpuint (yielded->len, ==, 1);
  g_assert_cmpstr (g_array_index (yielded, HlYield, 0).address.key, ==, "flue_gas_T");
  g_array_unref (yielded);
  g_autoptr (HlSolution) s = hl_solve (settled, NULL);
  test_assert_solved (s);
  g_assert_cmpfloat (test_value (s, "B1.flue_gas_T"), >, 400.0);
}

static void
test_derivatives (void)
{
  test_check_derivatives (WITH_DRUM ("feed.m=20 efficiency=0.9 fuel_lhv=20e6 fuel_hhv_ratio=1.1"));
  test_check_derivatives (FULL);
}

#define LOSSES(words) BOILER ("feed.m=20 efficiency_by:1 excess_air=0.15 dry_gas_constant=0.66 wet_gas_constant=0.009 unburned_fraction=0 " \
  "radiation_coefficient=0.0113 fuel_lhv=40e6 fuel_hhv_ratio=1.05 " words)

static void
test_findings (void)
{
  test_expect_finding (LOSSES ("flue_gas_T=353.15"), "flue-gas-too-cold", HL_GRADE_CAUTION,
                       "Flue gas of B1 leaves at 80.0 °C; even with clean fuel common are 90.0 °C and more.");
  test_expect_finding (LOSSES ("fuel:3 flue_gas_T=393.15 co2_factor=77e-9 biogenic_co2_factor=0"), "flue-gas-too-cold", HL_GRADE_CAUTION,
                       "Flue gas of B1 leaves at 120.0 °C; with sulphur in the fuel acid condenses on surfaces: common are 130.0 °C and more.");
  test_expect_finding (LOSSES ("flue_gas_T=281.15"), "flue-gas-too-cold", HL_GRADE_ERROR, "Flue gas of B1 would leave at 8.0 °C, colder than the air that comes in. Less heat must reach the water, or more fuel.");
}

int
main (int argc, char **argv)
{
  g_test_init (&argc, &argv, NULL);
  g_test_add_func ("/engine/boiler/blowdown-by-hand", test_blowdown_by_hand);
  g_test_add_func ("/engine/boiler/losses-by-hand", test_losses_by_hand);
  g_test_add_func ("/engine/boiler/options-bring-their-values", test_options_bring_their_values);
  g_test_add_func ("/engine/boiler/fuels-are-credible", test_fuels_are_credible);
  g_test_add_func ("/engine/boiler/in-a-plant", test_in_a_plant);
  g_test_add_func ("/engine/boiler/efficiency-given-finds-the-flue-gas", test_efficiency_given_finds_the_flue_gas);
  g_test_add_func ("/engine/boiler/derivatives", test_derivatives);
  g_test_add_func ("/engine/boiler/findings", test_findings);
  return g_test_run ();
}
