/* Thermal oils and brines: liquids without vapour, by polynomials over temperature.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#pragma once
#include "fluid/fluid.h"
G_BEGIN_DECLS

/* Their density depends on temperature alone; enthalpy and entropy follow from it and the heat
 * capacity without contradiction, with zeros at 273.15 K and 101325 Pa.  They have no dome, and
 * viscosity and conductivity by transport.h.  hl_fluid_load_file() reads a file of one's own. */
HL_PUBLIC gboolean hl_fluid_is_liquid (const HlFluid *fluid);

G_END_DECLS
