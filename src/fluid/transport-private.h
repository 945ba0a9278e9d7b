/* Parts of viscosity and thermal conductivity of water that the release's tables give apart.  SI throughout.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#pragma once
#include "fluid/fluid-private.h"
G_BEGIN_DECLS

/* Without the growth near the critical point: [Pa s], [W/(m K)]. */
double hl_water_viscosity_background    (double density, double T);
double hl_water_conductivity_background (double density, double T);

/* Correlation length [nm] from a state and the slope d(density)/dp [s2/m2] at 1.5 times the critical temperature. */
double hl_water_correlation_length (const HlState *state, double d_p_reference);

/* The factor by which viscosity grows near the critical point. */
double hl_water_viscosity_growth (double correlation_length);

G_END_DECLS
