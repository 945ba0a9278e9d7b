/* The pieces of water and steam that its dispatch shares.  SI throughout.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#pragma once
#include "fluid/fluid-private.h"
#include "fluid/if97-private.h"
G_BEGIN_DECLS

HlStatus hl_water_state_pT (const HlFluid *fluid, double p, double T, HlState *state);
HlStatus hl_water_state_ph (const HlFluid *fluid, double p, double h, HlState *state);
HlStatus hl_water_state_ps (const HlFluid *fluid, double p, double s, HlState *state);
HlStatus hl_water_state_hs (const HlFluid *fluid, double h, double s, HlState *state);
HlStatus hl_water_state_px (const HlFluid *fluid, double p, double x, HlState *state);
HlStatus hl_water_state_Tx (const HlFluid *fluid, double T, double x, HlState *state);
HlStatus hl_water_saturation_p (const HlFluid *fluid, double p, HlSaturation *saturation);
HlStatus hl_water_saturation_T (const HlFluid *fluid, double T, HlSaturation *saturation);
char    *hl_water_explain_failure (const HlFluid *fluid, HlStatus status, const char *pair, double a, double b);

/* Saturated liquid and vapour at a pair (p,T) on the line, complete but for x. */
HlStatus hl_water_saturated_ends (double p, double T, HlState *liquid, HlState *vapour);

/* The same as a saturation record; T_p is dTsat/dp. */
void hl_water_saturation_from_ends (const HlState *liquid, const HlState *vapour, double T_p, HlSaturation *saturation);

/* Equilibrium mixture of vapour fraction x. */
void hl_water_mix (const HlSaturation *saturation, double x, HlState *state);

/* Region 3 at (p,T); is_liquid chooses the branch below the critical temperature. */
HlStatus hl_water_region3_pT (double p, double T, gboolean is_liquid, HlState *state);

G_END_DECLS
