/* Where a medium's states lie, so that searches begin, step and end where the medium is; SI.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#pragma once
#include "fluid/fluid.h"
G_BEGIN_DECLS

typedef struct {
  const HlFluid *fluid;
  double p_low, p_high;           /* where a single unknown is looked for */
  double h_low, h_high, s_low, s_high, v_low, v_high, T_low, T_high;
  double p_usual, T_usual;        /* cold start: boiling moderately */
  double h_liquid, h_step;        /* liquid of the cold start, and the enthalpy that counts as far: its heat of evaporation */
} HlFluidScale;

/* Computed on first use and kept; any thread. */
const HlFluidScale *hl_fluid_scale (const HlFluid *fluid);
/* An enthalpy stated for water [J/kg] at the same place between liquid and vapour of this medium. */
double hl_fluid_scale_enthalpy (const HlFluidScale *scale, double h_water);
G_END_DECLS
