/* What an engineer asks when choosing a working fluid: kind of expansion, boiling point, hazards, stability.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "fluid/fluid-facts.h"

#include <math.h>
#include <string.h>

#include "fluid/gas-private.h"
#include "fluid/helmholtz-private.h"
#include "fluid/liquid-private.h"

/* The stretch of the saturation line that power cycles use. */
#define SHARE_LOW 0.60
#define SHARE_HIGH 0.88
#define N_STEPS 57

static HlExpansionType
expansion_of (const HlFluid *fluid)
{
  double T_c = fluid->limits.T_critical, low = fmax (SHARE_LOW * T_c, fluid->limits.T_min);
  guint n_rising = 0, n = 0;
  for (guint i = 0; i < N_STEPS; i++)
    {
      HlSaturation sat;
      double T = low + (SHARE_HIGH * T_c - low) * i / (N_STEPS - 1.0);
      if (hl_fluid_saturation_T (fluid, T, &sat) != HL_OK)
        continue;
      n++;
      n_rising += sat.s_vapour_p > 0.0;      /* p rises with T along the line */
    }
  return n_rising == 0 ? HL_EXPANSION_WET : n_rising == n ? HL_EXPANSION_DRY : HL_EXPANSION_ISENTROPIC;
}

/* ASHRAE 34: letter A or B for lower or higher toxicity, digit 1 for no flame propagation. */
static void
hazards_of (HlFluidFacts *facts)
{
  facts->is_flammable = facts->is_toxic = HL_HAZARD_UNKNOWN;
  if (facts->safety_class != NULL)
    {
      facts->is_toxic = facts->safety_class[0] == 'B' ? HL_HAZARD_YES : HL_HAZARD_NO;
      facts->is_flammable = facts->safety_class[1] != '1' ? HL_HAZARD_YES : HL_HAZARD_NO;
    }
  else if (facts->hazard != NULL)
    {
      if (strstr (facts->hazard, "flammable") != NULL)
        facts->is_flammable = HL_HAZARD_YES;
      if (strstr (facts->hazard, "toxic") != NULL)
        facts->is_toxic = HL_HAZARD_YES;
    }
}

/* Nothing is said of the hazards of a gas or an oil: they depend on where it comes from. */
static void
facts_without_dome (const HlFluid *fluid, HlFluidFacts *facts)
{
  *facts = (HlFluidFacts) {
    .source = hl_gas_is_mixture (fluid) ? hl_gas_data ()->source : hl_liquid_of (fluid)->source,
    .note = hl_gas_is_mixture (fluid) ? NULL : hl_liquid_of (fluid)->note, .expansion = HL_EXPANSION_NONE, .T_boiling = NAN,
    .is_flammable = HL_HAZARD_UNKNOWN, .is_toxic = HL_HAZARD_UNKNOWN, .gwp100 = NAN, .T_stable = NAN,
  };
}

/**
 * hl_fluid_facts:
 * @fluid: a fluid
 * @facts: (out): what is known; texts belong to the fluid
 *
 * The kind of expansion and the boiling point are computed, the rest comes from
 * the fluid's file with its sources.
 */
void
hl_fluid_facts (const HlFluid *fluid, HlFluidFacts *facts)
{
  if (!hl_fluid_has_dome (fluid))
    {
      facts_without_dome (fluid, facts);
      return;
    }
  const HlFluid *described = fluid == hl_fluid_water () ? hl_fluid_lookup ("water-95") : fluid;
  const HlHelmholtz *eq = hl_helmholtz_of (described);
  HlSaturation boiling;
  *facts = (HlFluidFacts) {
    .formula = eq->formula, .cas = eq->cas, .source = fluid == described ? eq->source : fluid->formulation, .note = eq->note,
    .expansion = expansion_of (fluid), .zero = fluid == described ? eq->zero : NULL, .T_boiling = NAN,
    .safety_class = eq->safety_class, .safety_source = eq->safety_source, .hazard = eq->hazard,
    .gwp100 = eq->gwp100, .gwp_source = eq->gwp_source,
    .T_stable = eq->T_stable, .stable_source = eq->stable_source, .is_stable_weak = eq->is_stable_weak,
  };
  if (fluid != described)
    facts->note = NULL;      /* it concerns the other formulation */
  hazards_of (facts);
  if (hl_fluid_saturation_p (fluid, 101325.0, &boiling) == HL_OK)
    facts->T_boiling = boiling.T;
}

/**
 * hl_expansion_type_name:
 * @type: a kind of expansion
 *
 * Returns: "wet", "isentropic", "dry" or "none"
 */
const char *
hl_expansion_type_name (HlExpansionType type)
{
  switch (type)
    {
    case HL_EXPANSION_WET: return "wet";
    case HL_EXPANSION_ISENTROPIC: return "isentropic";
    case HL_EXPANSION_DRY: return "dry";
    case HL_EXPANSION_NONE: return "none";
    }
  return "unknown";
}
