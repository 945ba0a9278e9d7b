/* Circuits on other media than water: which one a circuit carries, and solving on it from a cold start.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "laws.h"
#include "plant/circuit.h"
#include <math.h>
#include <string.h>

#define LOOP(medium) \
  "heat_input Q1 pressure_loss=0 steam.T=420\nturbine T1 inlet.p=10e5 isentropic_efficiency=0.82 mechanical_efficiency=0.985\ngenerator G1 efficiency=0.96\n" \
  "condenser C1 subcooling=0 cooling_inlet_T=288.15 cooling_rise=8 cooling_p=2e5 terminal_difference=5\npump P1 isentropic_efficiency=0.7 motor_efficiency=0.95\n" \
  "Q1.steam > T1.inlet\nT1.exhaust > C1.steam\nC1.condensate > P1.inlet\nP1.outlet > Q1.feed\nmedium 1 " medium "\n" \
  "shaft T1 G1\nplant net_power=1e6 other_consumption_fraction=0\n"

static double
h_ps (const HlFluid *fluid, double p, double s)
{
  HlState st;
  g_assert_cmpint (hl_fluid_state_ps (fluid, p, s, &st), ==, HL_OK);
  return st.h;
}

/* A simple organic cycle against the definitions, with the states of the fluid alone. */
static void
test_organic_loop_by_hand (void)
{
  g_autoptr (HlPlant) plant = test_plant (LOOP ("isopentane"));
  g_autoptr (HlSolution) s = hl_solve (plant, NULL);
  const HlFluid *fluid = hl_fluid_lookup ("isopentane"), *water = hl_fluid_water ();
  HlState inlet, cold, warm;
  HlSaturation sat;
  test_assert_solved (s);
  test_assert_balanced (s);
  g_assert_cmpint (hl_fluid_saturation_T (fluid, 288.15 + 8.0 + 5.0, &sat), ==, HL_OK);
  g_assert_cmpint (hl_fluid_state_pT (fluid, 10e5, 420.0, &inlet), ==, HL_OK);
  double expansion = 0.82 * (inlet.h - h_ps (fluid, sat.p, inlet.s)), compression = (h_ps (fluid, 10e5, sat.s_liquid) - sat.h_liquid) / 0.7;
  double m = 1e6 / (expansion * 0.985 * 0.96 - compression / 0.95);
  test_assert_near (test_value (s, "T1.inlet.m"), m, 1e-8);
  test_assert_near (test_value (s, "C1.steam.p"), sat.p, 1e-9);
  test_assert_near (test_value (s, "plant.cycle_efficiency"), (expansion * 0.985 - compression) / (inlet.h - sat.h_liquid - compression), 1e-8);
  /* What cools it is water, whatever is cooled. */
  g_assert_cmpint (hl_fluid_state_pT (water, 2e5, 288.15, &cold), ==, HL_OK);
  g_assert_cmpint (hl_fluid_state_pT (water, 2e5, 296.15, &warm), ==, HL_OK);
  test_assert_near (test_value (s, "C1.cooling_flow"), test_value (s, "C1.heat") / (warm.h - cold.h), 1e-8);
}

static void
test_derivatives (void)
{
  test_check_derivatives (LOOP ("isopentane"));
  test_check_derivatives (LOOP ("r245fa"));
}

/* Any medium that is liquid at 28 °C and vapour at 10 bar and 147 °C, from the same cold start. */
static void
test_many_media_from_cold (void)
{
  static const char *const media[] = { "isopentane", "pentane", "butane", "isobutane", "cyclopentane", "r245fa", "r1233zde", "r1224ydz", "r134a", "r1234zez",
                                       "ammonia", "propane", "acetone", "ethanol", "r365mfc", "hexane", "r1234yf" };
  for (guint k = 0; k < G_N_ELEMENTS (media); k++)
    {
      const HlFluid *fluid = hl_fluid_lookup (media[k]);
      HlSaturation hot, cold;
      /* Evaporate at 0.55 of the critical pressure where that is below 40 bar, 5 K of superheat. */
      HlFluidLimits limits;
      hl_fluid_limits (fluid, &limits);
      g_assert_cmpint (hl_fluid_saturation_T (fluid, 301.15, &cold), ==, HL_OK);
      double p = fmax (0.55 * limits.p_critical, 1.5 * cold.p);
      g_assert_cmpint (hl_fluid_saturation_p (fluid, p, &hot), ==, HL_OK);
      g_autofree char *text = g_strdup_printf (LOOP ("%s"), media[k]);
      g_autoptr (HlPlant) plant = test_plant_set (test_plant_set (test_plant (text), "T1.inlet.p", p), "Q1.steam.T", hot.T + 5.0);
      g_autoptr (HlSolution) s = hl_solve (plant, NULL);
      g_test_message ("%s: %.2f bar, %.1f K, efficiency %.4f", media[k], p / 1e5, hot.T, test_value (s, "plant.cycle_efficiency"));
      test_assert_solved (s);
      test_assert_balanced (s);
      double carnot = 1.0 - 301.15 / (hot.T + 5.0), efficiency = test_value (s, "plant.cycle_efficiency");
      g_assert_cmpfloat (efficiency, >, 0.3 * carnot);
      g_assert_cmpfloat (efficiency, <, 0.8 * carnot);
    }
}

/* Carbon dioxide above its critical pressure all the way on the hot side, condensed by cold water. */
#define CARBON_DIOXIDE \
  "turbine T1 inlet.p=200e5 inlet.T=573.15 isentropic_efficiency=0.85 mechanical_efficiency=0.985\ngenerator G1 efficiency=0.97\n" \
  "recuperator RE1 pinch=8 hot_pressure_loss=0.01 cold_pressure_loss=0.01\n" \
  "exchanger HX1 pinch=5 hot_pressure_loss=0.01 cold_pressure_loss=0.1 hot_outlet.T=298.15\n" \
  "heat_input Q1 pressure_loss=0.02\npump P1 isentropic_efficiency=0.75 motor_efficiency=0.95 inlet.p=%s\n" \
  "boundary Y1 direction:0 outlet.p=3e5 outlet.T=288.15\nboundary Y2 direction:1\n" \
  "Q1.steam > T1.inlet\nT1.exhaust > RE1.hot_inlet\nRE1.hot_outlet > HX1.hot_inlet\nHX1.hot_outlet > P1.inlet\nP1.outlet > RE1.cold_inlet\n" \
  "RE1.cold_outlet > Q1.feed\nY1.outlet > HX1.cold_inlet\nHX1.cold_outlet > Y2.inlet\nmedium 1 carbon-dioxide\nshaft T1 G1\n" \
  "plant net_power=5e6 other_consumption_fraction=0\n"

static void
test_transcritical_carbon_dioxide (void)
{
  /* Condensing at 66 bar, and cooled as a gas at 80 bar. */
  static const char *const pressures[] = { "66e5", "80e5" };
  for (guint k = 0; k < G_N_ELEMENTS (pressures); k++)
    {
      g_autofree char *text = g_strdup_printf (CARBON_DIOXIDE, pressures[k]);
      g_autoptr (HlPlant) plant = test_plant (text);
      g_autoptr (HlSolution) s = hl_solve (plant, NULL);
      test_assert_solved (s);
      test_assert_balanced (s);
      test_assert_near (test_value (s, "RE1.pinch"), 8.0, 1e-9);
      g_assert_cmpfloat (test_value (s, "plant.cycle_efficiency"), >, 0.2);
      g_assert_cmpfloat (test_value (s, "plant.cycle_efficiency"), <, 0.4);
      HlState in, out;
      g_assert_cmpint (hl_fluid_state_pT (hl_fluid_lookup ("carbon-dioxide"), 200e5, 573.15, &in), ==, HL_OK);
      test_assert_near (test_value (s, "T1.inlet.h"), in.h, 1e-9);
      g_assert_cmpint (hl_fluid_state_pT (hl_fluid_lookup ("carbon-dioxide"), test_value (s, "P1.inlet.p"), 298.15, &out), ==, HL_OK);
      test_assert_near (test_value (s, "P1.inlet.h"), out.h, 1e-9);
    }
}

static void
test_transcritical_derivatives (void)
{
  g_autofree char *text = g_strdup_printf (CARBON_DIOXIDE, "80e5");
  test_check_derivatives (text);
}

/* --- which medium a circuit carries -------------------------------------------- */

static void
test_whole_circuit_changes (void)
{
  g_autofree char *text = g_strdup_printf (CARBON_DIOXIDE, "80e5");
  g_autoptr (HlPlant) plant = test_plant (text);
  for (guint i = 0; i < hl_plant_n_streams (plant); i++)
    g_assert_cmpstr (hl_plant_stream (plant, i)->medium, ==, i < 6 ? "carbon-dioxide" : "water");
  g_autoptr (HlPlant) again = hl_plant_with_medium (plant, "8", "ethanol", NULL);
  g_assert_cmpstr (hl_plant_find_stream (again, "7")->medium, ==, "ethanol");
  g_assert_cmpstr (hl_plant_find_stream (again, "1")->medium, ==, "carbon-dioxide");
}

static void
test_unknown_medium_is_refused (void)
{
  g_autoptr (GError) error = NULL;
  g_autoptr (HlPlant) plant = test_plant (test_simple_loop);
  g_assert_null (hl_plant_with_medium (plant, "1", "whisky", &error));
  g_assert_cmpstr (error->message, ==, "there is no medium “whisky”; heatloom-batch fluids lists them");
  g_clear_error (&error);
  g_assert_null (hl_plant_with_medium (plant, "99", "water", &error));
  g_assert_cmpstr (error->message, ==, "there is no stream “99”");
}

static void
test_mixed_media_are_found_and_mended (void)
{
  g_autoptr (HlPlant) plant = test_plant (LOOP ("isopentane"));
  HlStream *odd = hl_stream_copy (hl_plant_find_stream (plant, "3"));
  odd->medium = g_intern_string ("water");
  g_autoptr (HlPlant) mixed = hl_plant_with_stream (plant, odd);
  g_autoptr (HlSolution) s = hl_solve (mixed, NULL);
  g_assert_false (hl_solution_is_solved (s));
  const HlFinding *finding = test_finding (s, "mixed-media");
  g_assert_nonnull (finding);
  g_assert_cmpint (finding->grade, ==, HL_GRADE_ERROR);
  g_assert_cmpstr (finding->text, ==, "In the circuit of stream 1 different media meet: Isopentane (streams 1, 2, 4) and Water and steam (stream 3). "
                                      "A circuit carries one medium; separate them by an exchanger, or make them one.");
  g_assert_cmpuint (finding->n_mends, ==, 2);
  g_assert_cmpstr (finding->mends[0].text, ==, "Make the circuit all Isopentane");
  g_assert_cmpint (finding->mends[0].kind, ==, HL_MEND_MEDIUM);
  g_assert_cmpstr (finding->mends[1].medium, ==, "water");
  g_autoptr (HlPlant) mended = hl_mend_apply (&finding->mends[0], mixed, NULL);
  g_assert_true (hl_plant_equal (mended, plant));
}

/* A port that no line reaches has the medium of the lines on its side. */
static void
test_open_port_takes_the_medium_of_its_circuit (void)
{
  g_autoptr (HlPlant) plant = test_plant ("boundary Y1 direction:0 outlet.p=10e5 outlet.T=420 outlet.m=1\nturbine T1 exhaust.p=1e5 isentropic_efficiency=0.8\n"
                                          "Y1.outlet > T1.inlet\nmedium 1 isopentane\n");
  g_autoptr (HlSolution) s = hl_solve (plant, NULL);
  HlState in;
  g_assert_cmpint (hl_fluid_state_pT (hl_fluid_lookup ("isopentane"), 10e5, 420.0, &in), ==, HL_OK);
  g_assert_nonnull (test_finding (s, "open-port"));
  test_assert_near (test_value (s, "T1.exhaust.h"), in.h - 0.8 * (in.h - h_ps (hl_fluid_lookup ("isopentane"), 1e5, in.s)), 1e-9);
}

static void
test_new_line_takes_over_the_medium (void)
{
  g_autoptr (HlPlant) plant = test_plant ("turbine T1\ncondenser C1\npump P1\nexchanger HX1\nT1.exhaust > C1.steam\nmedium 1 toluene\n");
  g_assert_cmpstr (hl_plant_line_medium (plant, "C1", "condensate", "P1", "inlet"), ==, "toluene");
  g_assert_cmpstr (hl_plant_line_medium (plant, "HX1", "hot_outlet", "T1", "inlet"), ==, "toluene");
  g_assert_cmpstr (hl_plant_line_medium (plant, "P1", "outlet", "HX1", "cold_inlet"), ==, "water");
  g_assert_null (hl_plant_port_medium (plant, "C1", "cooling_inlet"));
}

/* --- formulation of water -------------------------------------------------------- */

static void
test_formulation_of_the_plant (void)
{
  g_autofree char *text = g_strconcat (test_simple_loop, "formulation iapws95\n", NULL);
  g_autoptr (HlPlant) plant = test_plant (text), usual = test_plant (test_simple_loop);
  g_autoptr (HlSolution) s = hl_solve (plant, NULL), t = hl_solve (usual, NULL);
  HlStreamResult result;
  HlState in;
  test_assert_solved (s);
  hl_solution_stream (s, 0, &result);
  g_assert_true (result.fluid == hl_fluid_lookup ("water-95"));
  g_assert_cmpint (hl_fluid_state_pT (hl_fluid_lookup ("water-95"), 65e5, 758.15, &in), ==, HL_OK);
  test_assert_near (test_value (s, "T1.inlet.h"), in.h, 1e-12);
  /* Both formulations are good for the same steam: they differ, and not by much. */
  double a = test_value (s, "plant.cycle_efficiency"), b = test_value (t, "plant.cycle_efficiency");
  g_assert_cmpfloat (fabs (a - b), >, 1e-9);
  g_assert_cmpfloat (fabs (a - b), <, 3e-5);
}

static void
test_range_names_the_fluid (void)
{
  g_autofree char *text = g_strdup (LOOP ("isopentane"));
  g_autoptr (HlPlant) plant = test_plant_set (test_plant (text), "Q1.steam.T", 800.0);
  g_autoptr (HlSolution) s = hl_solve (plant, NULL);
  const HlFinding *finding = test_finding (s, "outside-range");
  g_assert_nonnull (finding);
  g_assert_nonnull (strstr (finding->text, "Isopentane"));
}

int
main (int argc, char **argv)
{
  g_test_init (&argc, &argv, NULL);
  g_test_add_func ("/engine/media/organic-loop", test_organic_loop_by_hand);
  g_test_add_func ("/engine/media/derivatives", test_derivatives);
  g_test_add_func ("/engine/media/many-from-cold", test_many_media_from_cold);
  g_test_add_func ("/engine/media/transcritical", test_transcritical_carbon_dioxide);
  g_test_add_func ("/engine/media/transcritical-derivatives", test_transcritical_derivatives);
  g_test_add_func ("/engine/media/whole-circuit", test_whole_circuit_changes);
  g_test_add_func ("/engine/media/unknown", test_unknown_medium_is_refused);
  g_test_add_func ("/engine/media/mixed", test_mixed_media_are_found_and_mended);
  g_test_add_func ("/engine/media/open-port", test_open_port_takes_the_medium_of_its_circuit);
  g_test_add_func ("/engine/media/new-line", test_new_line_takes_over_the_medium);
  g_test_add_func ("/engine/media/formulation", test_formulation_of_the_plant);
  g_test_add_func ("/engine/media/range", test_range_names_the_fluid);
  return g_test_run ();
}
