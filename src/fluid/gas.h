/* Ideal-gas mixtures: flue gas, air, their composition, the water in them.  SI throughout.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#pragma once
#include "fluid/fluid.h"
G_BEGIN_DECLS

/* A gas is a fluid with an id such as "air", "flue-gas" or
 * "gas:N2=0.75,CO2=0.08,H2O=0.10,O2=0.07" (mole fractions, all water as vapour;
 * they are scaled to a sum of 1).  hl_fluid_lookup() finds it; the same gas in
 * other words is the same fluid.  Enthalpies count from the elements at 298.15 K
 * and 1 bar, entropies from the third law, so that a balance over a flame closes
 * without a heat of reaction; water that condenses below the dew point stays in
 * the fluid as liquid: x is then the mass share of the gas. */

HL_PUBLIC guint          hl_gas_n_species      (void);
HL_PUBLIC const char    *hl_gas_species_formula (guint species);          /* "N2" */
HL_PUBLIC const char    *hl_gas_species_name   (guint species);           /* English name, translatable by the caller */
HL_PUBLIC double         hl_gas_species_molar_mass (guint species);       /* [kg/mol] */
HL_PUBLIC int            hl_gas_species_find   (const char *formula);     /* -1 when unknown */

/* fractions[] has hl_gas_n_species() entries; they are scaled to a sum of 1. */
HL_PUBLIC const HlFluid *hl_gas_by_moles       (const double fractions[], GError **error);
HL_PUBLIC const HlFluid *hl_gas_by_mass        (const double fractions[], GError **error);
HL_PUBLIC gboolean       hl_fluid_is_gas       (const HlFluid *fluid);
HL_PUBLIC void           hl_gas_moles          (const HlFluid *gas, double fractions[]);
HL_PUBLIC void           hl_gas_mass           (const HlFluid *gas, double fractions[]);
HL_PUBLIC double         hl_gas_zero_enthalpy  (const HlFluid *gas);      /* of the gas at 298.15 K, all water as vapour [J/kg] */

HL_PUBLIC double         hl_gas_water_dew_point (const HlFluid *gas, double p);     /* [K]; NaN without water, or where ice forms first */
/* Where sulphuric acid begins to condense [K]; @so3_share of the SO2 has become SO3.  NaN without sulphur or water. */
HL_PUBLIC double         hl_gas_acid_dew_point  (const HlFluid *gas, double p, double so3_share);
HL_PUBLIC double         hl_acid_dew_point      (double p_water, double p_so3);     /* from partial pressures [Pa] */

G_END_DECLS
