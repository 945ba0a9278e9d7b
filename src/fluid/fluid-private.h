/* What a working fluid must implement: the table of calls behind HlFluid.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#pragma once
#include "fluid/fluid.h"
G_BEGIN_DECLS

/* A fluid is a constant of this type; a new one (another equation of state)
 * adds its constant to the list in fluid.c.  The calls receive the fluid, so
 * that one implementation can serve many fluids by their data. */
struct _HlFluid {
  const char *id;
  const char *name;
  const char *formulation;
  HlFluidLimits limits;
  const void *data;        /* coefficients of the implementation, NULL where it needs none */

  HlStatus (*state_pT) (const HlFluid *fluid, double p, double T, HlState *state);
  HlStatus (*state_ph) (const HlFluid *fluid, double p, double h, HlState *state);
  HlStatus (*state_ps) (const HlFluid *fluid, double p, double s, HlState *state);
  HlStatus (*state_hs) (const HlFluid *fluid, double h, double s, HlState *state);
  HlStatus (*state_px) (const HlFluid *fluid, double p, double x, HlState *state);
  HlStatus (*state_Tx) (const HlFluid *fluid, double T, double x, HlState *state);
  HlStatus (*state_dT) (const HlFluid *fluid, double density, double T, HlState *state);   /* NULL: found by pressure, see fluid-density.c */
  HlStatus (*saturation_p) (const HlFluid *fluid, double p, HlSaturation *saturation);
  HlStatus (*saturation_T) (const HlFluid *fluid, double T, HlSaturation *saturation);
  char    *(*explain_failure) (const HlFluid *fluid, HlStatus status, const char *pair, double a, double b);
};

extern const HlFluid hl_water_if97;

/* Media by coefficient files, fluid-registry.c; NULL when unknown. */
const HlFluid *hl_registry_lookup (const char *id);

/* (density,T) by a search for the pressure, for fluids whose equations are not in density. */
HlStatus hl_density_by_pressure (const HlFluid *fluid, double density, double T, HlState *state);

G_END_DECLS
