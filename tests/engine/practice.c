/* Rules of practice: each one provoked, with its exact words and its source; and no code of a finding without a case.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "plants.h"
#include <math.h>
#include <string.h>

#define ORGANIC(medium, T, p_in, p_out) \
  "heat_input Q1 steam.T=" T " pressure_loss=0\nturbine T1 inlet.p=" p_in " exhaust.p=" p_out " isentropic_efficiency=0.8 mechanical_efficiency=0.98\n" \
  "generator G1 efficiency=0.96\ncondenser C1 subcooling=0 cooling_inlet_T=288.15 cooling_rise=8 cooling_p=2e5\npump P1 isentropic_efficiency=0.7 motor_efficiency=0.92\n" \
  "Q1.steam > T1.inlet\nT1.exhaust > C1.steam\nC1.condensate > P1.inlet\nP1.outlet > Q1.feed\nmedium 1 " medium "\nshaft T1 G1\n" \
  "plant net_power=5e5 other_consumption_fraction=0\n"
#define WITH_LOSS(loss) \
  "heat_input Q1 steam.T=758.15 pressure_loss=0\n" \
  "turbine T1 leaving_loss:1 inlet.p=65e5 exhaust.p=7000 isentropic_efficiency=0.83 exhaust_loss=" loss " mechanical_efficiency=0.985\n" \
  "generator G1 efficiency=0.98\ncondenser C1 subcooling=0 cooling_inlet_T=288.15 cooling_rise=10 cooling_p=2e5\npump P1 isentropic_efficiency=0.75 motor_efficiency=0.95\n" \
  "Q1.steam > T1.inlet\nT1.exhaust > C1.steam\nC1.condensate > P1.inlet\nP1.outlet > Q1.feed\nshaft T1 G1\nplant net_power=12e6 other_consumption_fraction=0\n"

typedef struct { const char *plant, *address; double value; const char *code; HlGrade grade; const char *text, *source; } Case;
static const Case cases[] = {
  { NULL, NULL, NAN, "pipe-steel", HL_GRADE_HINT,
    "Steam of Q1 leaves at 485.0 °C: above 454 °C neither carbon nor carbon-molybdenum steel will do for its pipe; use a Cr-Mo steel.",
    "graphitisation above 427 and 454 °C (800 and 850 °F): a boiler tube handbook" },
  { NULL, "Q1.steam.T", 713.15, "pipe-steel", HL_GRADE_HINT, "Steam of Q1 leaves at 440.0 °C: above 427 °C carbon steel will not do for its pipe.", NULL },
  { NULL, NULL, NAN, "exhaust-moisture", HL_GRADE_CAUTION,
    "Exhaust of T1 holds 10.2 % moisture at 0.07000 bar; above 10 % the last blades erode. Raise the exhaust pressure or the inlet temperature, or reheat.",
    "10 % by practitioners' notes, 12 % common practice, no source" },
  { WITH_LOSS ("60e3"), NULL, NAN, "leaving-velocity", HL_GRADE_CAUTION,
    "Exhaust loss of T1, 60.0 kJ/kg, means a leaving velocity of 346 m/s; above 300 m/s the last blades are too small. Choose a larger exhaust, or a higher exhaust pressure.",
    "150 to 300 m/s: common practice, no source; loss = c²/2 by definition" },
  { WITH_LOSS ("8e3"), NULL, NAN, "leaving-velocity", HL_GRADE_CAUTION,
    "Exhaust loss of T1, 8.0 kJ/kg, means a leaving velocity of 126 m/s; below 150 m/s the last blades are larger than they need to be.", NULL },
  { "reheat", NULL, NAN, "no-line-loss", HL_GRADE_HINT, "The extraction line from T2 to D1 has no pressure loss; 2 to 7 % are common.",
    "extraction lines lose 2 to 7 per cent of the pressure: common practice, no source" },
  { "reheat", "T2.extraction1.p", 20e5, "heater-rises", HL_GRADE_HINT, NULL, "textbook rule, from memory of El-Wakil: equal enthalpy rises are near the best" },
  { "reheat", "T1.extraction1.p", 120e5, "feed-temperature", HL_GRADE_HINT, NULL,
    "textbook rule, from memory: about n/(n+1) of the way from condenser to boiler saturation, lower for cost" },
  { ORGANIC ("isopentane", "420", "10e5", "1e5"), NULL, NAN, "medium-hazard", HL_GRADE_HINT,
    "The plant holds Isopentane: safety class A3: highly flammable. Codes such as EN 378, ISO 5149 and ATEX 2014/34/EU decide what that asks for.", NULL },
  { ORGANIC ("isopentane", "420", "10e5", "1e5"), NULL, NAN, "exhaust-superheat", HL_GRADE_HINT, NULL, "common practice, no source" },
  { ORGANIC ("isopentane", "420", "10e5", "0.95e5"), NULL, NAN, "vacuum-condenser", HL_GRADE_HINT,
    "C1 condenses at 0.9500 bar, below the ambient 1.013 bar: air leaks in, and a vacuum system is needed.", "common practice, no source" },
  { ORGANIC ("r1233zde", "431.05", "15e5", "1.5e5"), NULL, NAN, "medium-decays", HL_GRADE_CAUTION,
    "Stream 1 carries R1233zd(E) at 157.9 °C; above 150.0 °C it may decay, and at the tube wall it is hotter still. Ask the maker, or stay below.",
    "Purdue conference 2053: isomerises when held above" },
  { ORGANIC ("r134a", "342", "20e5", "7e5"), NULL, NAN, "wet-from-saturation", HL_GRADE_HINT,
    "T1 expands from saturation a medium whose expansion ends wet. Superheat it, or take a medium of another kind.", "common practice, no source" },
  { NULL, "T1.exhaust.p", 20e3, "unusual-value", HL_GRADE_HINT, NULL, "credible range of the component's table" },
};

static HlSolution *
solve_case (const Case *c)
{
  HlPlant *plant = test_plant (c->plant == NULL ? test_simple_loop : g_str_equal (c->plant, "reheat") ? test_reheat_plant : c->plant);
  if (c->address != NULL)
    plant = test_plant_set (plant, c->address, c->value);
  HlSolution *s = hl_solve (plant, NULL);
  hl_plant_unref (plant);
  return s;
}

static void
test_each_rule (void)
{
  for (guint k = 0; k < G_N_ELEMENTS (cases); k++)
    {
      const Case *c = &cases[k];
      g_autoptr (HlSolution) s = solve_case (c);
      const HlFinding *finding = test_finding (s, c->code);
      if (finding == NULL)
        {
          test_print (s);
          g_error ("case %u: no finding %s", k, c->code);
        }
      g_assert_cmpint (finding->grade, ==, c->grade);
      if (c->text != NULL)
        g_assert_cmpstr (finding->text, ==, c->text);
      g_assert_cmpstr (finding->source, !=, NULL);
      if (c->source != NULL)
        g_assert_cmpstr (finding->source, ==, c->source);
      g_assert_true (hl_finding_may_be_dismissed (finding));
      g_test_message ("%s", finding->text);
    }
}

/* Live and reheated steam of one boiler are one remark. */
static void
test_steel_is_said_once (void)
{
  g_autoptr (HlPlant) plant = test_plant (test_reheat_plant);
  g_autoptr (HlSolution) s = hl_solve (plant, NULL);
  guint n = 0;
  for (guint k = 0; k < hl_solution_n_findings (s); k++)
    n += g_str_equal (hl_solution_finding (s, k)->code, "pipe-steel");
  g_assert_cmpuint (n, ==, 1);
}

/* What is wrong has no source: laws need none. */
static void
test_laws_have_no_source (void)
{
  HlPlant *plant = test_plant_set (test_plant (test_simple_loop), "T1.exhaust.p", 70e5);
  g_autoptr (HlSolution) s = hl_solve (plant, NULL);
  hl_plant_unref (plant);
  g_assert_null (test_finding (s, "pressure-rises")->source);
}

/* --- errors that no other test meets ------------------------------------------------------ */

static void
test_other_errors (void)
{
  static const struct { const char *plant, *code, *begins; } rows[] = {
    { "boundary Y1 direction:0 outlet.p=40e5 outlet.T=673.15 outlet.m=10\nboundary Y2 direction:0 outlet.p=30e5 outlet.T=400\nboundary Y3 direction:1\n"
      "desuperheater DS1 pressure_loss=0.02 outlet_superheat=30\nY1.outlet > DS1.steam\nY2.outlet > DS1.spray\nDS1.outlet > Y3.inlet\n",
      "spray-uphill", "The spray of DS1 arrives at 30.00 bar, below the steam's 40.00 bar: it cannot flow in. Take it behind the feed pump." },
    { "boundary Y1 direction:0 outlet.p=10e5 outlet.T=500 outlet.m=1\nturbine T1 exhaust.p=5e5 isentropic_efficiency=0.8 mechanical_efficiency=1\nboundary Y2 direction:1\n"
      "boundary Y3 direction:0 outlet.p=1e5 outlet.T=300 outlet.m=100\npump P1 outlet.p=100e5 isentropic_efficiency=0.8 motor_efficiency=0.95\nboundary Y4 direction:1\n"
      "generator G1 efficiency=0.98\nY1.outlet > T1.inlet\nT1.exhaust > Y2.inlet\nY3.outlet > P1.inlet\nP1.outlet > Y4.inlet\nshaft T1 P1 G1\nplant other_consumption_fraction=0\n",
      "shaft-power", "The shaft of generator G1 takes more power than its turbines give: -1.1" },
    { "heat_input Q1 steam.T=758.15 pressure_loss=0\nturbine T1 inlet.p=65e5 isentropic_efficiency=0.83 mechanical_efficiency=0.985\n"
      "generator G1 efficiency=0.98\ncondenser C1 subcooling=0 cooling_rise=10 terminal_difference=5 cooling_pressure_loss=0 cleanliness=0.85\n"
      "pump P1 isentropic_efficiency=0.75 motor_efficiency=0.95\npump P2 isentropic_efficiency=0.8 motor_efficiency=0.95\n"
      "cooling_tower CT1 air:1 wet_bulb_T=291.15 approach=6 water_outlet.p=1e5 lift=1e5 evaporation_fraction=0.016 drift_fraction=0.01 cycles=5\n"
      "Q1.steam > T1.inlet\nT1.exhaust > C1.steam\nC1.condensate > P1.inlet\nP1.outlet > Q1.feed\n"
      "CT1.water_outlet > P2.inlet\nP2.outlet > C1.cooling_inlet\nC1.cooling_outlet > CT1.water_inlet\nshaft T1 G1\nplant net_power=12e6 other_consumption_fraction=0\n",
      "negative-blowdown", "Drift alone keeps the water of CT1 thinner than its cycles of concentration say. Lower them." },
  };
  for (guint k = 0; k < G_N_ELEMENTS (rows); k++)
    {
      g_autoptr (HlPlant) plant = test_plant (rows[k].plant);
      g_autoptr (HlSolution) s = hl_solve (plant, NULL);
      const HlFinding *finding = test_finding (s, rows[k].code);
      if (finding == NULL || !g_str_has_prefix (finding->text, rows[k].begins))
        {
          test_print (s);
          g_error ("not said: %s", rows[k].begins);
        }
      g_assert_cmpint (finding->grade, ==, HL_GRADE_ERROR);
      g_assert_false (hl_solution_is_solved (s));
    }
}

/* No live steam pressure makes so much of the heat. */
static void
test_no_solution (void)
{
  HlPlant *plant = test_plant_set (test_plant_let_go (test_plant (test_simple_loop), "T1.inlet.p"), "plant.cycle_efficiency", 0.9);
  g_autoptr (HlSolution) s = hl_solve (plant, NULL);
  hl_plant_unref (plant);
  const HlFinding *finding = test_finding (s, "no-solution");
  if (finding == NULL)
    test_print (s);
  g_assert_nonnull (finding);
  g_assert_nonnull (strstr (finding->text, "What could not be met: "));
  g_assert_nonnull (strstr (finding->text, ". Last values: "));
  g_assert_cmpuint (finding->n_mends, >, 0);
}

/* A kind that the tables know and the engine does not. */
static void
test_unknown_kind (void)
{
  static HlKind odd;
  odd = *hl_kind_lookup ("valve");
  odd.id = "teapot";
  odd.name = "Teapot";
  g_autoptr (HlPlant) empty = hl_plant_new ();
  g_autoptr (HlPlant) plant = hl_plant_with_component (empty, hl_component_new_bare (&odd, "X1", 0, 0));
  g_autoptr (HlSolution) s = hl_solve (plant, NULL);
  g_assert_nonnull (test_finding (s, "unknown-kind"));
  g_assert_cmpstr (test_finding (s, "unknown-kind")->text, ==, "X1 is a Teapot, which this version cannot calculate. Remove it or put another kind in its place.");
}

/* --- no code without a case -------------------------------------------------------------- */

static void
add_codes_of (const char *path, GHashTable *codes)
{
  g_autofree char *text = NULL;
  g_autoptr (GRegex) call = g_regex_new ("(?:hl_check_add|hl_findings_add) \\(.*?\"([a-z]+(?:-[a-z]+)+)\"", G_REGEX_DOTALL, 0, NULL);
  g_autoptr (GMatchInfo) match = NULL;
  g_assert_true (g_file_get_contents (path, &text, NULL, NULL));
  for (g_regex_match (call, text, 0, &match); g_match_info_matches (match); g_match_info_next (match, NULL))
    g_hash_table_add (codes, g_match_info_fetch (match, 1));
}

static void
for_files (const char *folder, const char *suffix, void (*act) (const char *path, GHashTable *table), GHashTable *table)
{
  g_autoptr (GDir) dir = g_dir_open (folder, 0, NULL);
  g_assert_nonnull (dir);
  for (const char *name = g_dir_read_name (dir); name != NULL; name = g_dir_read_name (dir))
    {
      g_autofree char *path = g_build_filename (folder, name, NULL);
      if (g_str_has_suffix (name, suffix))
        act (path, table);
    }
}

/* Codes that a test asks for by name. */
static void
add_words_of (const char *path, GHashTable *words)
{
  g_autofree char *text = NULL;
  g_autoptr (GRegex) word = g_regex_new ("\"([a-z]+(?:-[a-z]+)+)\"", 0, 0, NULL);
  g_autoptr (GMatchInfo) match = NULL;
  g_assert_true (g_file_get_contents (path, &text, NULL, NULL));
  for (g_regex_match (word, text, 0, &match); g_match_info_matches (match); g_match_info_next (match, NULL))
    g_hash_table_add (words, g_match_info_fetch (match, 1));
}

static void
test_every_code_is_provoked (void)
{
  g_autoptr (GHashTable) codes = g_hash_table_new_full (g_str_hash, g_str_equal, g_free, NULL), words = g_hash_table_new_full (g_str_hash, g_str_equal, g_free, NULL);
  g_autofree char *engine = g_test_build_filename (G_TEST_DIST, "..", "src", "engine", NULL), *components = g_build_filename (engine, "components", NULL);
  g_autofree char *tests = g_test_build_filename (G_TEST_DIST, "engine", NULL);
  g_autoptr (GString) missing = g_string_new (NULL);
  GHashTableIter iter;
  gpointer code;
  for_files (engine, ".c", add_codes_of, codes);
  for_files (components, ".c", add_codes_of, codes);
  for_files (tests, ".c", add_words_of, words);
  g_assert_cmpuint (g_hash_table_size (codes), >, 40);
  g_hash_table_iter_init (&iter, codes);
  while (g_hash_table_iter_next (&iter, &code, NULL))
    if (!g_hash_table_contains (words, code))
      g_string_append_printf (missing, " %s", (const char *) code);
  if (missing->len > 0)
    g_error ("no test provokes:%s", missing->str);
}

int
main (int argc, char **argv)
{
  g_test_init (&argc, &argv, NULL);
  g_test_add_func ("/engine/practice/each-rule", test_each_rule);
  g_test_add_func ("/engine/practice/steel-is-said-once", test_steel_is_said_once);
  g_test_add_func ("/engine/practice/laws-have-no-source", test_laws_have_no_source);
  g_test_add_func ("/engine/practice/other-errors", test_other_errors);
  g_test_add_func ("/engine/practice/no-solution", test_no_solution);
  g_test_add_func ("/engine/practice/unknown-kind", test_unknown_kind);
  g_test_add_func ("/engine/practice/every-code-is-provoked", test_every_code_is_provoked);
  return g_test_run ();
}
