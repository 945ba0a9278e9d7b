/* What an engineer asks when choosing a working fluid.  SI throughout.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#pragma once
#include "fluid/fluid.h"
G_BEGIN_DECLS

/* How saturated vapour expands at constant entropy. */
typedef enum {
  HL_EXPANSION_WET,         /* into the wet region: ds''/dT is negative throughout */
  HL_EXPANSION_ISENTROPIC,  /* the sign of ds''/dT changes: nearly along the line */
  HL_EXPANSION_DRY,         /* into superheated vapour: ds''/dT is positive throughout */
  HL_EXPANSION_NONE,        /* a gas or liquid without saturation line */
} HlExpansionType;

typedef enum { HL_HAZARD_NO, HL_HAZARD_YES, HL_HAZARD_UNKNOWN } HlHazard;

/* Texts are NULL and numbers NaN where nothing is known here, which is not the same as harmless. */
typedef struct {
  const char     *formula, *cas, *source, *note;    /* source: of the equation of state */
  HlExpansionType expansion;                        /* between 0.60 and 0.88 of the critical temperature */
  const char     *zero;                             /* state with h = s = 0: "NBP", "IIR" ...; "as published": by its paper; NULL: not known */
  double          T_boiling;                        /* at 101325 Pa [K]; NaN where it is no liquid there */
  const char     *safety_class, *safety_source;     /* ASHRAE 34: "A1" ... "B3" */
  const char     *hazard;                           /* how to treat it where it has no class */
  HlHazard        is_flammable, is_toxic;
  double          gwp100;
  const char     *gwp_source;
  double          T_stable;                         /* caution above: the substance decays [K] */
  const char     *stable_source;
  gboolean        is_stable_weak;                   /* the source of T_stable is weak */
} HlFluidFacts;

HL_PUBLIC void        hl_fluid_facts          (const HlFluid *fluid, HlFluidFacts *facts);
HL_PUBLIC const char *hl_expansion_type_name  (HlExpansionType type);      /* "wet", "isentropic", "dry", "none" */

G_END_DECLS
