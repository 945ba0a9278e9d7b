/* Facts about working fluids against trade knowledge and handbook values.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "fluid/fluid-facts.h"

#include "media.h"
#include "validation.h"

/* Kinds computed before with other code from the same equations (sign of ds/dT of
 * saturated vapour at 0.60 to 0.88 of the critical temperature); they agree with what
 * texts on organic cycles list, from memory. */
static void
test_kinds_of_expansion (void)
{
  static const struct { HlExpansionType type; const char *ids; } rows[] = {
    { HL_EXPANSION_WET, "water water-95 ammonia carbon-dioxide r32 r134a propane acetone ethanol nitrogen helium" },
    { HL_EXPANSION_ISENTROPIC, "butane isobutane cyclopentane benzene r245fa r1224ydz r1233zde r1234yf r1234zee r1234zez r1336mzze r227ea" },
    { HL_EXPANSION_DRY, "pentane isopentane hexane octane cyclohexane toluene ethylbenzene p-xylene r365mfc mm mdm md2m d4 d5" },
  };
  for (gsize i = 0; i < G_N_ELEMENTS (rows); i++)
    {
      g_auto (GStrv) ids = g_strsplit (rows[i].ids, " ", -1);
      for (guint k = 0; ids[k] != NULL; k++)
        {
          HlFluidFacts facts;
          hl_fluid_facts (hl_fluid_lookup (ids[k]), &facts);
          if (facts.expansion != rows[i].type)
            g_error ("%s expands %s, not %s", ids[k], hl_expansion_type_name (facts.expansion), hl_expansion_type_name (rows[i].type));
        }
    }
}

/* Each saying has its source; the classes speak of hazards as ANSI/ASHRAE 34 defines its letters and digits. */
static void
test_hazards_follow_the_classes (void)
{
  static const struct { const char *id; HlHazard is_flammable, is_toxic; } rows[] = {
    { "r134a", HL_HAZARD_NO, HL_HAZARD_NO },   { "r32", HL_HAZARD_YES, HL_HAZARD_NO },      { "propane", HL_HAZARD_YES, HL_HAZARD_NO },
    { "ammonia", HL_HAZARD_YES, HL_HAZARD_YES }, { "r245fa", HL_HAZARD_NO, HL_HAZARD_YES }, { "benzene", HL_HAZARD_YES, HL_HAZARD_YES },
    { "toluene", HL_HAZARD_YES, HL_HAZARD_UNKNOWN }, { "r365mfc", HL_HAZARD_UNKNOWN, HL_HAZARD_UNKNOWN }, { "water", HL_HAZARD_NO, HL_HAZARD_NO },
  };
  g_auto (GStrv) ids = all_media ();
  for (gsize i = 0; i < G_N_ELEMENTS (rows); i++)
    {
      HlFluidFacts facts;
      hl_fluid_facts (hl_fluid_lookup (rows[i].id), &facts);
      g_assert_cmpint (facts.is_flammable, ==, rows[i].is_flammable);
      g_assert_cmpint (facts.is_toxic, ==, rows[i].is_toxic);
    }
  for (guint i = 0; ids[i] != NULL; i++)
    {
      HlFluidFacts facts;
      hl_fluid_facts (hl_fluid_lookup (ids[i]), &facts);
      g_assert_nonnull (facts.source);
      g_assert_nonnull (facts.cas);
      g_assert_true ((facts.safety_class == NULL) == (facts.safety_source == NULL));
      g_assert_true (isnan (facts.gwp100) == (facts.gwp_source == NULL));
      g_assert_true (isnan (facts.T_stable) == (facts.stable_source == NULL));
      if (!isnan (facts.T_stable) && strstr (facts.stable_source, "weak") != NULL)
        g_assert_true (facts.is_stable_weak);
    }
}

/* Normal boiling points from memory of the CRC Handbook of Chemistry and Physics and of
 * makers' tables, to the digits that these agree on. */
static void
test_boiling_points_are_those_of_handbooks (void)
{
  static const struct { const char *id; double T_celsius, within; } rows[] = {
    { "water", 99.97, 0.01 },  { "ammonia", -33.33, 0.03 }, { "r134a", -26.07, 0.02 },  { "propane", -42.1, 0.1 },  { "isobutane", -11.7, 0.2 },
    { "butane", -0.5, 0.1 },   { "isopentane", 27.8, 0.2 }, { "pentane", 36.1, 0.1 },   { "toluene", 110.6, 0.1 },  { "benzene", 80.1, 0.1 },
    { "ethanol", 78.3, 0.2 },  { "acetone", 56.1, 0.3 },    { "cyclohexane", 80.7, 0.1 }, { "hexane", 68.7, 0.1 },  { "octane", 125.6, 0.2 },
    { "r245fa", 15.1, 0.2 },   { "nitrogen", -195.8, 0.05 }, { "helium", -268.93, 0.03 }, { "r32", -51.65, 0.05 },  { "r123", 27.8, 0.2 },
  };
  for (gsize i = 0; i < G_N_ELEMENTS (rows); i++)
    {
      HlFluidFacts facts;
      hl_fluid_facts (hl_fluid_lookup (rows[i].id), &facts);
      validate ("Media: boiling points at 1 atm", rows[i].id, "CRC Handbook of Chemistry and Physics and makers' tables, from memory", "boiling point", "°C",
                rows[i].T_celsius, facts.T_boiling - 273.15, rows[i].within, 5);
    }
  HlFluidFacts facts;
  hl_fluid_facts (hl_fluid_lookup ("carbon-dioxide"), &facts);
  g_assert_true (isnan (facts.T_boiling));       /* sublimes: its triple point lies above 1 atm */
}

int
main (int argc, char *argv[])
{
  g_test_init (&argc, &argv, NULL);
  g_test_add_func ("/fluid/fluid-facts/expansion", test_kinds_of_expansion);
  g_test_add_func ("/fluid/fluid-facts/hazards", test_hazards_follow_the_classes);
  g_test_add_func ("/fluid/fluid-facts/boiling-points", test_boiling_points_are_those_of_handbooks);
  return g_test_run ();
}
