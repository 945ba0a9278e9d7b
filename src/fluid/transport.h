/* Viscosity, thermal conductivity and surface tension.  SI throughout.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#pragma once
#include "fluid/fluid.h"
G_BEGIN_DECLS

HL_PUBLIC gboolean hl_fluid_has_transport   (const HlFluid *fluid);
HL_PUBLIC HlStatus hl_fluid_viscosity       (const HlFluid *fluid, const HlState *state, double *viscosity) G_GNUC_WARN_UNUSED_RESULT;      /* [Pa s] */
HL_PUBLIC HlStatus hl_fluid_conductivity    (const HlFluid *fluid, const HlState *state, double *conductivity) G_GNUC_WARN_UNUSED_RESULT;   /* [W/(m K)] */
HL_PUBLIC HlStatus hl_fluid_surface_tension (const HlFluid *fluid, double T, double *tension) G_GNUC_WARN_UNUSED_RESULT;                    /* [N/m] */

G_END_DECLS
