/* Findings: each one provoked, with its exact words, where it points and what it offers.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "laws.h"
#include <math.h>
#include <string.h>

static HlSolution *
solve_taken (HlPlant *plant)
{
  HlSolution *s = hl_solve (plant, NULL);
  hl_plant_unref (plant);
  return s;
}

static HlSolution *
solve_with (const char *text, const char *address, double value)
{
  return solve_taken (test_plant_set (test_plant (text), address, value));
}

static HlSolution *
solve_without (const char *text, const char *address)
{
  return solve_taken (test_plant_let_go (test_plant (text), address));
}

/* The finding of a code has these words, this grade, and @n_mends mends. */
static const HlFinding *
assert_finding (const HlSolution *s, const char *code, HlGrade grade, const char *text)
{
  const HlFinding *finding = test_finding (s, code);
  if (finding == NULL)
    {
      test_print (s);
      g_error ("no finding %s", code);
    }
  g_assert_cmpstr (finding->text, ==, text);
  g_assert_cmpint (finding->grade, ==, grade);
  g_assert_true ((grade == HL_GRADE_ERROR) == !hl_solution_is_solved (s) || grade != HL_GRADE_ERROR);
  return finding;
}

static void
assert_mend (const HlFinding *finding, guint n, HlMendKind kind, const char *address, const char *text)
{
  g_assert_cmpuint (finding->n_mends, >, n);
  g_autofree char *at = hl_address_to_text (&finding->mends[n].address);
  g_assert_cmpint (finding->mends[n].kind, ==, kind);
  g_assert_cmpstr (at, ==, address);
  g_assert_cmpstr (finding->mends[n].text, ==, text);
}

/* --- structure ------------------------------------------------------------------- */

static void
test_empty_plant (void)
{
  g_autoptr (HlSolution) s = solve_taken (hl_plant_new ());
  g_autofree char *summary = hl_solution_summary (s);
  g_assert_cmpuint (hl_solution_n_findings (s), ==, 0);
  g_assert_cmpuint (hl_solution_n_results (s), ==, 0);
  g_assert_cmpstr (summary, ==, "Nothing drawn yet: drag a component from the shelf");
}

static void
test_open_ports (void)
{
  g_autoptr (HlSolution) s = solve_taken (test_plant ("new pump P1\nnew condenser C1\nC1.condensate > P1.inlet\n"));
  const HlFinding *finding = assert_finding (s, "open-port", HL_GRADE_ERROR, "P1 is not connected at its outlet. Draw a line to it.");
  assert_mend (finding, 0, HL_MEND_CONNECT, "P1.outlet", "Show outlet of P1");
  g_assert_cmpuint (hl_solution_n_findings (s), ==, 2);   /* and the condenser's steam inlet; its drain may stay open */
}

static void
test_missing_values (void)
{
  g_autoptr (HlSolution) power = solve_without (test_simple_loop, "plant.net_power");
  const HlFinding *finding = assert_finding (power, "missing-value", HL_GRADE_ERROR,
    "One value is missing: net power of the plant, heat to live steam of Q1 or heat to working fluid of Q1.");
  assert_mend (finding, 0, HL_MEND_GIVE, "plant.net_power", "Give net power of the plant: 10.00 MW");
  test_assert_near (finding->mends[0].value, 10e6, 1e-15);

  g_autoptr (HlSolution) condenser = solve_without (test_simple_loop, "T1.exhaust.p");
  finding = assert_finding (condenser, "missing-value", HL_GRADE_ERROR,
    "One value is missing: condenser pressure of C1, terminal temperature difference of C1 or heat rejected of C1.");
  assert_mend (finding, 0, HL_MEND_GIVE, "C1.steam.p", "Give condenser pressure of C1: 0.07000 bar");

  g_autoptr (HlSolution) heater = solve_without (test_reheat_plant, "H1.terminal_difference");
  assert_finding (heater, "missing-value", HL_GRADE_ERROR,
    "One value is missing: terminal temperature difference of H1, feed outlet temperature of H1 or heat transferred of H1.");

  g_autoptr (HlSolution) three = solve_taken (test_plant_let_go (test_plant_let_go (test_plant_let_go (test_plant (test_simple_loop),
    "T1.inlet.p"), "plant.net_power"), "Q1.steam.T"));
  finding = test_finding (three, "missing-value");
  g_assert_nonnull (finding);
  g_assert_true (g_str_has_prefix (finding->text, "3 values are missing, for instance "));
}

/* Pressing the first button of a deficit one after the other ends in a solved plant. */
static void
test_mends_of_deficits_mend (void)
{
  HlPlant *plant = test_plant_let_go (test_plant_let_go (test_plant_let_go (test_plant (test_simple_loop), "T1.inlet.p"), "plant.net_power"), "T1.exhaust.p");
  for (int k = 0; k < 3; k++)
    {
      g_autoptr (HlSolution) s = hl_solve (plant, NULL);
      g_autoptr (GError) error = NULL;
      const HlFinding *finding = test_finding (s, "missing-value");
      g_assert_nonnull (finding);
      g_assert_cmpuint (finding->n_mends, >, 0);
      HlPlant *next = hl_mend_apply (&finding->mends[0], plant, &error);
      g_assert_no_error (error);
      hl_plant_unref (plant);
      plant = next;
    }
  g_autoptr (HlSolution) s = solve_taken (plant);
  test_assert_solved (s);
}

/* One missing and one extra at once, in different places. */
static void
test_missing_and_surplus_at_once (void)
{
  g_autoptr (HlSolution) s = solve_taken (test_plant_set (test_plant_let_go (test_plant (test_reheat_plant), "D1.outlet_subcooling"), "B1.feed.p", 155e5));
  g_assert_nonnull (test_finding (s, "missing-value"));
  const HlFinding *surplus = test_finding (s, "surplus-value");
  g_assert_nonnull (surplus);
  g_assert_nonnull (strstr (surplus->text, "(155.0 bar)"));
  g_assert_false (hl_solution_is_solved (s));
}

static void
test_surplus (void)
{
  g_autoptr (HlSolution) s = solve_with (test_simple_loop, "T1.inlet.m", 10.0);
  const HlFinding *finding = assert_finding (s, "surplus-value", HL_GRADE_ERROR,
    "One value too many: let one of these be found: mass flow at steam inlet of T1 (10.00 kg/s), net power of the plant (12.00 MW) or exhaust pressure of T1 (0.07000 bar).");
  assert_mend (finding, 1, HL_MEND_LET_GO, "plant.net_power", "Let net power of the plant be found");
  g_autoptr (GError) error = NULL;
  g_autoptr (HlPlant) mended = hl_mend_apply (&finding->mends[1], hl_solution_plant (s), &error);
  g_autoptr (HlSolution) after = hl_solve (mended, NULL);
  test_assert_solved (after);
}

static void
test_two_too_many (void)
{
  g_autoptr (HlSolution) s = solve_taken (test_plant_set (test_plant_set (test_plant (test_simple_loop), "T1.inlet.m", 10.0), "C1.heat", 20e6));
  const HlFinding *finding = test_finding (s, "surplus-value");
  g_assert_nonnull (finding);
  g_assert_true (g_str_has_prefix (finding->text, "2 values too many: let some be found, for instance heat rejected of C1 (20.00 MW), mass flow at steam inlet of T1 (10.00 kg/s) or net power"));
}

/* Two typed pressures of one vessel; the valve that is offered makes it solvable. */
static void
test_pressures_meet (void)
{
  g_autoptr (HlSolution) s = solve_taken (test_plant_set (test_plant_set (test_plant_let_go (test_plant (test_industrial_plant), "L2.heat_loss"), "L2.heat_loss", 0.0), "U1.condensate.p", 3e5));
  const HlFinding *finding = assert_finding (s, "pressures-meet", HL_GRADE_ERROR,
    "Two pressures meet: vessel pressure of D1 (2.500 bar) and condensate pressure of U1 (3.000 bar) are one and the same. Let one of them be found, or insert a throttle valve between them.");
  assert_mend (finding, 0, HL_MEND_INSERT_VALVE, ":10", "Insert a throttle valve in stream 10");
  g_autoptr (GError) error = NULL;
  g_autoptr (HlPlant) mended = hl_mend_apply (&finding->mends[0], hl_solution_plant (s), &error);
  g_assert_no_error (error);
  g_autoptr (HlPlant) settled = hl_settle (mended, NULL, NULL);
  g_autoptr (HlSolution) after = hl_solve (settled, NULL);
  test_assert_solved (after);
  test_assert_near (test_value (after, "V2.inlet.p"), 3e5, 1e-12);
  test_assert_near (test_value (after, "V2.outlet.p"), 2.5e5, 1e-12);
}

static void
test_circuit_that_loses_water (void)
{
  g_autoptr (HlSolution) s = solve_taken (test_plant ("heat_input Q1 steam.p=50e5 steam.T=700 pressure_loss=0\n"
    "steam_user U1 heat=5e6 return_fraction=0.8 condensate.T=350\npump P1 isentropic_efficiency=0.7 motor_efficiency=0.9\nvalve V1\n"
    "Q1.steam > V1.inlet\nV1.outlet > U1.steam\nU1.condensate > P1.inlet\nP1.outlet > Q1.feed\n"));
  const HlFinding *finding = assert_finding (s, "no-make-up", HL_GRADE_ERROR,
    "U1 does not return all its steam, and its circuit has no make-up water. Add a make-up, or return all of it.");
  assert_mend (finding, 0, HL_MEND_GIVE, "U1.return_fraction", "Return all of it from U1");
}

/* As many values as needed, but all of them differences: a loop without a pressure. */
static void
test_nothing_holds_the_pressure (void)
{
  g_autoptr (HlSolution) s = solve_taken (test_plant ("heat_input Q1 steam.T=700 pressure_loss=0 steam.m=1\npipe L1 pressure_loss=0 heat_loss=0\n"
    "Q1.steam > L1.inlet\nL1.outlet > Q1.feed\n"));
  const HlFinding *finding = assert_finding (s, "not-determined", HL_GRADE_ERROR,
    "The values around Q1 and L1 do not settle pressure of stream 1 and pressure of stream 2: as many are given as needed, but some say the same thing. Give another one, and let one of those be found.");
  g_assert_cmpuint (finding->n_mends, >, 0);
}

/* --- impossible values ---------------------------------------------------------------- */

static void
test_exhaust_above_inlet (void)
{
  g_autoptr (HlSolution) s = solve_with (test_simple_loop, "T1.exhaust.p", 70e5);
  const HlFinding *finding = assert_finding (s, "pressure-rises", HL_GRADE_ERROR,
    "Steam cannot expand in T1: exhaust pressure of T1 (70.00 bar) is above inlet pressure of T1 (65.00 bar). Lower the first or raise the second.");
  assert_mend (finding, 0, HL_MEND_EDIT, "T1.exhaust.p", "Change exhaust pressure of T1");
  g_assert_true (finding == hl_solution_finding (s, 0));
  g_autoptr (HlSolution) extraction = solve_with (test_large_plant, "T2.extraction1.p", 8e5);
  assert_finding (extraction, "pressure-rises", HL_GRADE_ERROR,
    "Steam cannot expand in T2: extraction pressure 2 of T2 (9.600 bar) is above extraction pressure 1 of T2 (8.000 bar). Lower the first or raise the second.");
}

static void
test_pressure_rising_in_a_boiler (void)
{
  g_autoptr (HlSolution) s = solve_taken (test_plant_set (test_plant_let_go (test_plant (test_simple_loop), "Q1.pressure_loss"), "P1.outlet.p", 60e5));
  assert_finding (s, "pressure-rises", HL_GRADE_ERROR,
    "Pressure would rise through Q1: pressure loss of Q1 comes out as -8.33 %. Lower the pressure behind it, or raise the one before it.");
  g_assert_false (hl_solution_is_solved (s));
}

static void
test_heater_outlet_hotter_than_its_steam (void)
{
  g_autoptr (HlSolution) s = solve_taken (test_plant_set (test_plant_let_go (test_plant (test_reheat_plant), "H1.terminal_difference"), "H1.feed_outlet.T", 673.15));
  assert_finding (s, "heater-outlet-too-hot", HL_GRADE_ERROR,
    "Heater H1: steam arrives at 339.8 °C and condenses at 242.6 °C, but the feedwater is to leave at 400.0 °C. Lower the feedwater outlet temperature or raise the steam pressure.");
  /* Between condensing and steam temperature a zone inside crosses, though both ends look well. */
  g_autoptr (HlSolution) inside = solve_taken (test_plant_set (test_plant_let_go (test_plant (test_reheat_plant), "H1.terminal_difference"), "H1.feed_outlet.T", 533.15));
  const HlFinding *finding = test_finding (inside, "temperature-cross");
  g_assert_nonnull (finding);
  g_assert_cmpstr (finding->text, ==, "Heater H1: in its desuperheating zone the feedwater would be 6.6 K hotter than the steam side. Raise the terminal difference or the steam pressure.");
}

static void
test_beyond_the_formulation (void)
{
  g_autoptr (HlSolution) s = solve_with (test_simple_loop, "T1.inlet.p", 1200e5);
  const HlFinding *finding = assert_finding (s, "outside-range", HL_GRADE_ERROR,
    "P1: a state lies outside the range of the property formulation: 1200 bar is above 1000 bar, the highest pressure of IAPWS-IF97. Look at inlet pressure of T1.");
  assert_mend (finding, 0, HL_MEND_EDIT, "T1.inlet.p", "Change inlet pressure of T1");
  g_autoptr (HlSolution) T = solve_with (test_simple_loop, "Q1.steam.T", 2300.0);
  assert_finding (T, "outside-range", HL_GRADE_ERROR,
    "Q1: a state lies outside the range of the property formulation: 2300 K is above 2273.15 K, the highest temperature of IAPWS-IF97. Look at steam temperature of Q1.");
  /* A heater above the critical pressure has no saturation. */
  g_autoptr (HlSolution) heater = solve_taken (test_plant_set (test_plant_set (test_plant (test_reheat_plant), "T1.inlet.p", 300e5), "T1.extraction1.p", 250e5));
  finding = test_finding (heater, "outside-range");
  g_assert_nonnull (finding);
  g_assert_true (g_str_has_prefix (finding->text, "H1: a state lies outside the range of the property formulation: "));
}

static void
test_impossible_neighbours (void)
{
  g_autoptr (HlSolution) cooling = solve_with (test_simple_loop, "C1.cooling_inlet_T", 330.07);
  assert_finding (cooling, "temperature-cross", HL_GRADE_ERROR,
    "Cooling water of C1 would leave at 66.9 °C, but the steam condenses at 39.0 °C. Raise the condenser pressure or lower the cooling water temperature.");
  g_autoptr (HlSolution) drain = solve_with (test_reheat_plant, "H1.drain_approach", 100.0);
  assert_finding (drain, "drain-too-hot", HL_GRADE_ERROR, "Heater H1: its drain would leave at 261.5 °C, above saturation, 242.6 °C. Lower the drain approach.");
  g_autoptr (HlSolution) valve = solve_with (test_reheat_plant, "T2.extraction1.p", 36e5);
  const HlFinding *rises = NULL;
  for (guint k = 0; k < hl_solution_n_findings (valve); k++)
    if (g_str_equal (hl_solution_finding (valve, k)->at.id, "V1"))
      rises = hl_solution_finding (valve, k);
  g_assert_nonnull (rises);
  g_assert_cmpstr (rises->text, ==, "Pressure would rise through V1, from 35.00 bar to 36.00 bar. Lower the pressure behind it, or raise the one before it.");
  g_autoptr (HlSolution) pump = solve_with (test_reheat_plant, "T2.extraction1.p", 5000.0);
  assert_finding (pump, "pressure-falls", HL_GRADE_ERROR, "P1 is to pump from 0.06000 bar down to 0.05000 bar. Raise its outlet pressure, or put a valve in its place.");
  assert_finding (pump, "heater-too-hot", HL_GRADE_ERROR,
    "Open heater D1 needs -0.816 kg/s of steam, less than nothing: what flows in brings more heat than water at 32.9 °C takes. Raise its pressure.");
  g_autoptr (HlSolution) water = solve_with (test_simple_loop, "Q1.steam.T", 500.0);
  assert_finding (water, "water-at-turbine", HL_GRADE_ERROR,
    "Water, not steam, reaches T1: at its inlet pressure 226.9 °C is below boiling. Raise the temperature or lower the pressure.");
  g_autoptr (HlSolution) cold = solve_with (test_simple_loop, "Q1.steam.T", 300.0);
  assert_finding (cold, "heat-runs-backwards", HL_GRADE_ERROR, "Q1 would cool what it is to heat: in at 172.1 kJ/kg, out at 118.5 kJ/kg. Raise the outlet temperature.");
  assert_finding (cold, "nothing-to-condense", HL_GRADE_ERROR, "What enters C1 holds no more heat than its condensate: there is nothing to condense.");
}

static void
test_drain_uphill (void)
{
  g_autoptr (HlSolution) s = solve_taken (test_plant (
    "boundary Y1 direction:0 outlet.p=2e5 outlet.T=450 outlet.m=1\nboundary Y2 direction:0 outlet.p=1e5 outlet.T=360 outlet.m=0.5\n"
    "boundary Y3 direction:0 outlet.p=20e5 outlet.T=330\nboundary Y4 direction:1\nboundary Y5 direction:1\n"
    "closed_heater H1 terminal_difference=3 drain_approach=5 feed_pressure_loss=0\n"
    "Y1.outlet > H1.steam\nY2.outlet > H1.drain_inlet\nY3.outlet > H1.feed_inlet\nH1.feed_outlet > Y4.inlet\nH1.drain > Y5.inlet\n"));
  assert_finding (s, "drain-uphill", HL_GRADE_ERROR,
    "The drain into H1 arrives at 1.000 bar, below the shell's 2.000 bar: it cannot flow in. Pump it, or lead it elsewhere.");
}

static void
test_negative_flow (void)
{
  g_autoptr (HlSolution) s = solve_taken (test_plant (
    "boundary Y1 direction:0 outlet.p=2e5 outlet.T=300 outlet.m=1\nsplitter X1 outlet1.m=1.5\nboundary Y2 direction:1\nboundary Y3 direction:1\n"
    "Y1.outlet > X1.inlet\nX1.outlet1 > Y2.inlet\nX1.outlet2 > Y3.inlet\n"));
  assert_finding (s, "negative-flow", HL_GRADE_ERROR, "Stream 3 from X1 to Y3 would flow backwards: -0.500 kg/s. The values around it ask for the impossible.");
}

/* A ratio of two powers instead of one of them: only a plant at rest has it. */
static void
test_nothing_flows (void)
{
  g_autoptr (HlSolution) s = solve_taken (test_plant_set (test_plant_let_go (test_plant (test_simple_loop), "plant.net_power"), "plant.back_work_ratio", 0.009));
  const HlFinding *finding = assert_finding (s, "nothing-flows", HL_GRADE_ERROR,
    "Nothing flows: the values given say how flows and powers relate, but not how large they are. Give the net power or a flow.");
  assert_mend (finding, 0, HL_MEND_EDIT, "plant.net_power", "Enter net power of the plant");
}

/* An efficiency above one slips past the tables where an outlet state is typed: entropy would vanish. */
static void
test_entropy_destroyed (void)
{
  g_autoptr (HlSolution) s = solve_taken (test_plant_set (test_plant_let_go (test_plant (test_simple_loop), "T1.isentropic_efficiency"), "T1.exhaust.x", 0.70));
  double lost = test_value (s, "T1.inlet.m") * (test_value (s, "T1.inlet.s") - test_value (s, "T1.exhaust.s")) / 1e3;
  g_autofree char *text = g_strdup_printf (
    "T1 would destroy entropy, %.3f kW/K: against the second law. Check its efficiency, and the pressures and temperatures around it.", lost);
  g_assert_cmpfloat (lost, >, 1.0);
  assert_finding (s, "entropy-destroyed", HL_GRADE_ERROR, text);
}

static void
test_pump_draws_steam (void)
{
  g_autoptr (HlSolution) s = solve_taken (test_plant ("boundary Y1 direction:0 outlet.p=1e5 outlet.x=0.05 outlet.m=1\n"
    "pump P1 outlet.p=10e5 isentropic_efficiency=0.7 motor_efficiency=0.9\nboundary Y2 direction:1\nY1.outlet > P1.inlet\nP1.outlet > Y2.inlet\n"));
  assert_finding (s, "pump-steam", HL_GRADE_ERROR, "P1 draws water with 5.0 % steam in it: a pump needs liquid. Condense it first.");
}

static void
test_generator_on_no_shaft (void)
{
  HlPlant *plant = test_plant (test_simple_loop);
  const char *ids[] = { "S1", NULL };
  HlPlant *without = hl_plant_without (plant, ids);
  hl_plant_unref (plant);
  g_autoptr (HlSolution) s = solve_taken (without);
  assert_finding (s, "no-shaft", HL_GRADE_WARNING, "Generator G1 is on no shaft and gives no power. Join it to a turbine.");
  g_assert_true (hl_solution_is_solved (s));   /* the turbine then gives its power as if without that loss */
  test_assert_near (test_value (s, "plant.gross_power"), test_value (s, "T1.power"), 1e-12);
}

/* --- practice ------------------------------------------------------------------------- */

/* Moisture of the simple loop's exhaust, from the properties alone. */
static double
moisture_at (double p)
{
  HlState live, ideal;
  HlSaturation sat;
  g_assert_cmpint (hl_fluid_state_pT (hl_fluid_water (), 65e5, 758.15, &live), ==, HL_OK);
  g_assert_cmpint (hl_fluid_state_ps (hl_fluid_water (), p, live.s, &ideal), ==, HL_OK);
  g_assert_cmpint (hl_fluid_saturation_p (hl_fluid_water (), p, &sat), ==, HL_OK);
  return (sat.h_vapour - (live.h - 0.83 * (live.h - ideal.h))) / (sat.h_vapour - sat.h_liquid);
}

static void
test_practice (void)
{
  g_autoptr (HlSolution) moist = solve_with (test_simple_loop, "T1.exhaust.p", 7000.0);
  const HlFinding *finding = assert_finding (moist, "exhaust-moisture", HL_GRADE_CAUTION,
    "Exhaust of T1 holds 10.2 % moisture at 0.07000 bar; above 10 % the last blades erode. Raise the exhaust pressure or the inlet temperature, or reheat.");
  assert_mend (finding, 0, HL_MEND_EDIT, "T1.exhaust.p", "Change exhaust pressure of T1");
  g_autoptr (HlSolution) vacuum = solve_with (test_simple_loop, "T1.exhaust.p", 2500.0);
  g_autofree char *wet = g_strdup_printf (
    "Exhaust of T1 holds %.1f %% moisture at 0.02500 bar; above 12 %% the last blades erode. Raise the exhaust pressure or the inlet temperature, or reheat.",
    100.0 * moisture_at (2500.0));
  g_assert_cmpfloat (moisture_at (2500.0), >, 0.12);
  assert_finding (vacuum, "exhaust-moisture", HL_GRADE_WARNING, wet);
  assert_finding (vacuum, "condenser-pressure", HL_GRADE_CAUTION,
    "Condenser pressure of C1 is 0.02500 bar; below 30 mbar the last blades and the air extraction grow large.");
  static const struct { double T; HlGrade grade; const char *text; } hot[] = {
    { 830.15, HL_GRADE_CAUTION, "Steam of Q1 leaves at 557.0 °C: above 550 °C low-alloy Cr-Mo steels end." },
    { 870.15, HL_GRADE_CAUTION, "Steam of Q1 leaves at 597.0 °C: above 593 °C use steel P92 rather than P91." },
    { 900.15, HL_GRADE_WARNING, "Steam of Q1 leaves at 627.0 °C: above 620 °C the piping must be austenitic steel." },
    { 980.15, HL_GRADE_WARNING, "Steam of Q1 leaves at 707.0 °C: above 700 °C only nickel alloys will do." },
  };
  for (guint k = 0; k < G_N_ELEMENTS (hot); k++)
    {
      g_autoptr (HlSolution) s = solve_with (test_simple_loop, "Q1.steam.T", hot[k].T);
      assert_finding (s, "steam-temperature", hot[k].grade, hot[k].text);
    }
  g_autoptr (HlSolution) cool = solve_with (test_simple_loop, "Q1.steam.T", 813.15);
  g_assert_null (test_finding (cool, "steam-temperature"));
  g_autoptr (HlSolution) close = solve_with (test_reheat_plant, "H1.drain_approach", 1.5);
  assert_finding (close, "small-difference", HL_GRADE_CAUTION, "Heater H1: only 1.5 K remain in its subcooling zone; less than 2 K asks for a very large surface.");
  g_autoptr (HlSolution) closer = solve_with (test_reheat_plant, "H1.drain_approach", 0.5);
  assert_finding (closer, "small-difference", HL_GRADE_WARNING, "Heater H1: only 0.50 K remain in its subcooling zone; less than 2 K asks for a very large surface.");
  g_autoptr (HlSolution) reheat = solve_taken (test_plant_set (test_plant_set (test_plant (test_reheat_plant), "T1.exhaust.p", 60e5), "T1.extraction1.p", 65e5));
  assert_finding (reheat, "reheat-pressure", HL_GRADE_HINT, "Reheat of B1 runs at 43 % of the live steam pressure; the best is often 20 to 25 %.");
  g_autoptr (HlSolution) unusual = solve_with (test_simple_loop, "P1.isentropic_efficiency", 0.95);
  /* What was found counts as what was typed. */
  assert_finding (unusual, "unusual-value", HL_GRADE_HINT, "Unusual value: terminal temperature difference of C1 comes out as 14.0 K; common are 2.8 K to 8.0 K.");
  const HlFinding *typed = NULL;
  for (guint k = 0; k < hl_solution_n_findings (unusual); k++)
    if (hl_solution_finding (unusual, k)->at.id == g_intern_static_string ("P1"))
      typed = hl_solution_finding (unusual, k);
  g_assert_nonnull (typed);
  g_assert_cmpstr (typed->text, ==, "Unusual value: isentropic efficiency of P1 is 0.950; common are 0.400 to 0.870.");
}

static void
test_close_to_the_critical_pressure (void)
{
  g_autoptr (HlSolution) s = solve_with (test_simple_loop, "T1.inlet.p", 215e5);
  const HlFinding *finding = assert_finding (s, "near-critical", HL_GRADE_CAUTION,
    "Q1 evaporates at 215.0 bar, above 95 % of the critical pressure: control is difficult there. Stay below, or go above the critical pressure.");
  assert_mend (finding, 0, HL_MEND_EDIT, "Q1.steam.p", "Change pressure at steam outlet of Q1");
  g_autoptr (HlSolution) below = solve_with (test_simple_loop, "T1.inlet.p", 205e5), above = solve_with (test_simple_loop, "T1.inlet.p", 250e5);
  g_assert_null (test_finding (below, "near-critical"));
  g_assert_null (test_finding (above, "near-critical"));
}

/* What was put aside is not among the findings; what is graver than a caution cannot be. */
static void
test_dismissed (void)
{
  HlAddress wet = hl_address_component ("T1", "exhaust_moisture");
  HlPlant *plant = test_plant (test_simple_loop), *aside = hl_plant_with_dismissed (plant, "exhaust-moisture", &wet, TRUE);
  g_autoptr (HlSolution) before = solve_taken (plant), after = solve_taken (aside);
  g_assert_nonnull (test_finding (before, "exhaust-moisture"));
  g_assert_cmpuint (hl_solution_n_dismissed (before), ==, 0);
  g_assert_null (test_finding (after, "exhaust-moisture"));
  g_assert_cmpuint (hl_solution_n_findings (after), ==, hl_solution_n_findings (before) - 1);
  g_assert_cmpuint (hl_solution_n_dismissed (after), ==, 1);
  g_assert_cmpstr (hl_solution_dismissed (after, 0)->code, ==, "exhaust-moisture");
  g_assert_true (hl_finding_may_be_dismissed (hl_solution_dismissed (after, 0)));

  HlPlant *wetter = hl_plant_ref (hl_solution_plant (after));
  g_autoptr (HlSolution) warning = solve_taken (test_plant_set (wetter, "T1.exhaust.p", 2500.0));
  const HlFinding *finding = test_finding (warning, "exhaust-moisture");
  g_assert_nonnull (finding);
  g_assert_cmpint (finding->grade, ==, HL_GRADE_WARNING);
  g_assert_false (hl_finding_may_be_dismissed (finding));
}

/* What a button cannot do it says; what only points somewhere changes nothing. */
static void
test_mends_that_do_nothing (void)
{
  g_autoptr (HlPlant) plant = test_plant (test_simple_loop);
  g_autoptr (GError) error = NULL;
  HlMend gone = { .kind = HL_MEND_INSERT_VALVE, .address = hl_address_stream ("99", "") };
  g_assert_null (hl_mend_apply (&gone, plant, &error));
  g_assert_error (error, HL_PLANT_ERROR, HL_PLANT_ERROR_ADDRESS);
  g_assert_cmpstr (error->message, ==, "there is no stream 99 any more");
  g_clear_error (&error);
  HlMend impossible = { .kind = HL_MEND_GIVE, .address = hl_address_component ("T1", "isentropic_efficiency"), .value = 7.0 };
  g_assert_null (hl_mend_apply (&impossible, plant, &error));
  g_assert_error (error, HL_PLANT_ERROR, HL_PLANT_ERROR_OUT_OF_RANGE);
  HlMend show = { .kind = HL_MEND_CONNECT, .address = hl_address_component ("T1", "inlet") };
  g_autoptr (HlPlant) same = hl_mend_apply (&show, plant, NULL);
  g_assert_true (same == plant);
}

static void
test_gravest_first (void)
{
  g_autoptr (HlSolution) s = solve_taken (test_plant_set (test_plant_set (test_plant (test_reheat_plant), "B1.steam.T", 900.15), "P1.isentropic_efficiency", 0.95));
  g_assert_cmpuint (hl_solution_n_findings (s), >=, 2);
  for (guint k = 1; k < hl_solution_n_findings (s); k++)
    g_assert_cmpint (hl_solution_finding (s, k - 1)->grade, >=, hl_solution_finding (s, k)->grade);
  g_assert_true (hl_solution_has_grade (s, HL_GRADE_WARNING));
  g_assert_false (hl_solution_has_grade (s, HL_GRADE_ERROR));
  g_assert_cmpstr (hl_grade_id (HL_GRADE_CAUTION), ==, "caution");
  g_assert_cmpstr (hl_grade_name (HL_GRADE_ERROR), ==, "error");
}

/* Condenser pressure and terminal difference put in, and the water warmer than both allow. */
static void
test_cooling_water_would_cool_down (void)
{
  test_expect_finding ("heat_input Q1 steam.T=758.15 pressure_loss=0\nturbine T1 inlet.p=65e5 isentropic_efficiency=0.83 mechanical_efficiency=0.985\n"
    "generator G1 efficiency=0.98\ncondenser C1 subcooling=0 steam.p=7000 cooling_inlet_T=308.15 terminal_difference=6 cooling_p=2e5\n"
    "pump P1 isentropic_efficiency=0.75 motor_efficiency=0.95\n"
    "Q1.steam > T1.inlet\nT1.exhaust > C1.steam\nC1.condensate > P1.inlet\nP1.outlet > Q1.feed\nshaft T1 G1\nplant net_power=12e6 other_consumption_fraction=0\n",
    "heat-runs-backwards", HL_GRADE_ERROR, "Cooling water of C1 would leave 2.0 K colder than it comes in. Raise the condenser pressure or lower the cooling water temperature.");
}

/* A pump of hardly any efficiency heats its water beyond what the formulation covers; nothing else asks for that state. */
static void
test_state_beyond_the_formulation (void)
{
  test_expect_finding ("boundary Y1 direction:0 outlet.p=1e5 outlet.T=300 outlet.m=5\nboundary Y2 direction:1\npump P1 outlet.p=200e5 isentropic_efficiency=0.0005 motor_efficiency=0.95\n"
    "Y1.outlet > P1.inlet\nP1.outlet > Y2.inlet\n", "outside-range", HL_GRADE_ERROR, "P1: a state lies outside the range of the property formulation");
}

int
main (int argc, char **argv)
{
  g_test_init (&argc, &argv, NULL);
  g_test_add_func ("/engine/finding/empty-plant", test_empty_plant);
  g_test_add_func ("/engine/finding/open-ports", test_open_ports);
  g_test_add_func ("/engine/finding/missing-values", test_missing_values);
  g_test_add_func ("/engine/finding/mends-of-deficits-mend", test_mends_of_deficits_mend);
  g_test_add_func ("/engine/finding/missing-and-surplus-at-once", test_missing_and_surplus_at_once);
  g_test_add_func ("/engine/finding/surplus", test_surplus);
  g_test_add_func ("/engine/finding/two-too-many", test_two_too_many);
  g_test_add_func ("/engine/finding/pressures-meet", test_pressures_meet);
  g_test_add_func ("/engine/finding/circuit-that-loses-water", test_circuit_that_loses_water);
  g_test_add_func ("/engine/finding/nothing-holds-the-pressure", test_nothing_holds_the_pressure);
  g_test_add_func ("/engine/finding/exhaust-above-inlet", test_exhaust_above_inlet);
  g_test_add_func ("/engine/finding/pressure-rising-in-a-boiler", test_pressure_rising_in_a_boiler);
  g_test_add_func ("/engine/finding/heater-outlet-hotter-than-its-steam", test_heater_outlet_hotter_than_its_steam);
  g_test_add_func ("/engine/finding/beyond-the-formulation", test_beyond_the_formulation);
  g_test_add_func ("/engine/finding/impossible-neighbours", test_impossible_neighbours);
  g_test_add_func ("/engine/finding/drain-uphill", test_drain_uphill);
  g_test_add_func ("/engine/finding/negative-flow", test_negative_flow);
  g_test_add_func ("/engine/finding/nothing-flows", test_nothing_flows);
  g_test_add_func ("/engine/finding/entropy-destroyed", test_entropy_destroyed);
  g_test_add_func ("/engine/finding/pump-draws-steam", test_pump_draws_steam);
  g_test_add_func ("/engine/finding/generator-on-no-shaft", test_generator_on_no_shaft);
  g_test_add_func ("/engine/finding/practice", test_practice);
  g_test_add_func ("/engine/finding/close-to-the-critical-pressure", test_close_to_the_critical_pressure);
  g_test_add_func ("/engine/finding/dismissed", test_dismissed);
  g_test_add_func ("/engine/finding/mends-that-do-nothing", test_mends_that_do_nothing);
  g_test_add_func ("/engine/finding/gravest-first", test_gravest_first);
  g_test_add_func ("/engine/finding/cooling-water-would-cool-down", test_cooling_water_would_cool_down);
  g_test_add_func ("/engine/finding/state-beyond-the-formulation", test_state_beyond_the_formulation);
  return g_test_run ();
}
