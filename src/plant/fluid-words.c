/* Words for what is known of media, translated.  The fluid folder speaks English only; what it names stands here for translation.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "plant/fluid-words.h"
#include "plant/i18n.h"

/* Names of the media that come with the program; those of a user's own file stay as they are. */
static const char *const names[] = {
  N_("Acetone"),
  N_("Ammonia"),
  N_("Benzene"),
  N_("n-Butane"),
  N_("Carbon dioxide"),
  N_("Cyclohexane"),
  N_("Cyclopentane"),
  N_("Octamethylcyclotetrasiloxane (D4)"),
  N_("Decamethylcyclopentasiloxane (D5)"),
  N_("Ethanol"),
  N_("Ethylbenzene"),
  N_("Helium"),
  N_("n-Hexane"),
  N_("Isobutane"),
  N_("Isopentane"),
  N_("Decamethyltetrasiloxane (MD2M)"),
  N_("Octamethyltrisiloxane (MDM)"),
  N_("Hexamethyldisiloxane (MM)"),
  N_("Nitrogen"),
  N_("n-Octane"),
  N_("p-Xylene"),
  N_("n-Pentane"),
  N_("Propane"),
  N_("R1224yd(Z)"),
  N_("R123"),
  N_("R1233zd(E)"),
  N_("R1234yf"),
  N_("R1234ze(E)"),
  N_("R1234ze(Z)"),
  N_("R1336mzz(E)"),
  N_("R134a"),
  N_("R227ea"),
  N_("R245fa"),
  N_("R32"),
  N_("R365mfc"),
  N_("Toluene"),
  N_("Water and steam (1995 formulation)"),
  N_("Water and steam"),
  /* xgettext:no-c-format */
  N_("Calcium chloride brine, 20 %"),
  N_("Diphenyl and diphenyl oxide, eutectic"),
  N_("Engine oil, unused"),
  N_("Ethylene glycol brine, 30 %"),
  N_("Mineral oil"),
  N_("Propylene glycol brine, 40 %"),
  N_("Air"),
  N_("Flue gas"),
};

gboolean
hl_words_know_fluid (const HlFluid *fluid)
{
  for (guint i = 0; i < G_N_ELEMENTS (names); i++)
    if (g_str_equal (names[i], hl_fluid_name (fluid)))
      return TRUE;
  return FALSE;
}

const char *
hl_words_of_fluid (const HlFluid *fluid)
{
  return _(hl_fluid_name (fluid));
}

const char *
hl_words_of_expansion (HlExpansionType type)
{
  switch (type)
    {
    /* Translators: how saturated vapour expands. */
    case HL_EXPANSION_WET: return _("wet");
    case HL_EXPANSION_ISENTROPIC: return _("isentropic");
    case HL_EXPANSION_DRY: return _("dry");
    case HL_EXPANSION_NONE: return _("gas");
    }
  return "";
}

char *
hl_words_of_safety (const HlFluid *fluid)
{
  HlFluidFacts facts;
  hl_fluid_facts (fluid, &facts);
  if (facts.safety_class != NULL)
    return g_strdup (facts.safety_class);
  if (facts.is_toxic == HL_HAZARD_YES && facts.is_flammable == HL_HAZARD_YES)
    return g_strdup (_("flammable, toxic"));
  return g_strdup (facts.is_flammable == HL_HAZARD_YES ? _("flammable") : facts.is_toxic == HL_HAZARD_YES ? _("toxic") : "–");
}

const char *
hl_words_of_cycle (HlCyclePossible possible)
{
  switch (possible)
    {
    case HL_CYCLE_POSSIBLE: return "";
    case HL_CYCLE_NO_DOME: return _("does not evaporate");
    case HL_CYCLE_ABOVE_CRITICAL: return _("source too hot: near or above the critical point");
    case HL_CYCLE_BELOW_RANGE: return _("sink too cold for its equation");
    case HL_CYCLE_OUTSIDE: return _("outside the range of its equation");
    case HL_CYCLE_NO_DIFFERENCE: return _("source and sink too close");
    }
  return "";
}
