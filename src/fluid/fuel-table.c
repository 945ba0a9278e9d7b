/* Substances of fuels and named fuels, with their sources.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "fluid/fuel-private.h"

#include <math.h>

/* Enthalpies of formation at 298.15 K of what is no species of data/gases/: B. E. Poling, J. M. Prausnitz, J. P. O'Connell:
 * The Properties of Gases and Liquids, 5th ed. 2001, and CRC Handbook of Chemistry and Physics; both from memory. */
const HlFuelSubstance hl_fuel_substances[] = {
  { "CH4", 1, 4, 0, 0, 0, NAN, FALSE },
  { "C2H6", 2, 6, 0, 0, 0, NAN, FALSE },
  { "C3H8", 3, 8, 0, 0, 0, NAN, FALSE },
  { "C4H10", 4, 10, 0, 0, 0, -125.79e3, FALSE },       /* n-butane */
  { "i-C4H10", 4, 10, 0, 0, 0, -134.99e3, FALSE },
  { "C5H12", 5, 12, 0, 0, 0, -146.76e3, FALSE },       /* n-pentane */
  { "C6H14", 6, 14, 0, 0, 0, -166.92e3, FALSE },       /* n-hexane */
  { "C2H4", 2, 4, 0, 0, 0, 52.50e3, FALSE },
  { "C3H6", 3, 6, 0, 0, 0, 20.00e3, FALSE },
  { "C2H2", 2, 2, 0, 0, 0, 228.20e3, FALSE },
  { "C6H6", 6, 6, 0, 0, 0, 82.88e3, FALSE },
  { "H2", 0, 2, 0, 0, 0, NAN, FALSE },
  { "CO", 1, 0, 1, 0, 0, NAN, FALSE },
  { "H2S", 0, 2, 0, 0, 1, -20.63e3, FALSE },
  { "NH3", 0, 3, 0, 1, 0, NAN, FALSE },
  { "CO2", 1, 0, 2, 0, 0, NAN, FALSE },
  { "N2", 0, 0, 0, 2, 0, NAN, FALSE },
  { "O2", 0, 0, 2, 0, 0, NAN, FALSE },
  { "H2O", 0, 2, 1, 0, 0, NAN, FALSE },
  { "CH3OH(l)", 1, 4, 1, 0, 0, -238.91e3, TRUE },
  { "C2H5OH(l)", 2, 6, 1, 0, 0, -277.60e3, TRUE },
  { "C8H18(l)", 8, 18, 0, 0, 0, -249.95e3, TRUE },     /* n-octane */
  { "C", 1, 0, 0, 0, 0, 0.0, TRUE },                   /* graphite: an element */
};
const guint hl_n_fuel_substances = G_N_ELEMENTS (hl_fuel_substances);

#define IPCC "lower heating value and CO2: IPCC Guidelines 2006, vol. 2, tables 1.2 and 1.4; the rest of the analysis: common practice, no source"
#define PRACTICE "composition: common practice, no source"
#define PURE "pure substance"

/* The carbon of the fuels of the IPCC follows from their CO2 per unit of heat. */
const HlNamedFuel hl_named_fuels[] = {
  { "natural-gas", "mole:CH4=0.929,C2H6=0.042,C3H8=0.01,C4H10=0.004,N2=0.008,CO2=0.007", 1.0,
    "composition: common practice, no source; it gives the 48.0 MJ/kg and 56.1 kg/GJ of the IPCC Guidelines 2006, vol. 2, tables 1.2 and 1.4, within 1 %" },
  { "methane", "mole:CH4=1", 1.0, PURE },
  { "propane", "mole:C3H8=1", 1.0, PURE },
  { "hydrogen", "mole:H2=1", 1.0, PURE },
  { "carbon", "mole:C=1", 1.0, PURE },
  { "biogas", "mole:CH4=0.6,CO2=0.385,N2=0.01,H2S=0.0005,H2O=0.0045", 0.0, PRACTICE },
  { "wood-gas", "mole:H2=0.18,CO=0.2,CH4=0.025,CO2=0.12,N2=0.475", 0.0, PRACTICE },
  { "furnace-gas", "mole:H2=0.035,CO=0.235,CO2=0.215,N2=0.515", 1.0, PRACTICE },
  { "coke-oven-gas", "mole:H2=0.585,CH4=0.25,CO=0.065,C2H4=0.025,CO2=0.02,N2=0.055", 1.0, PRACTICE },
  { "gas-oil", "mass:C=0.8696,H=0.1288,S=0.001,N=0.0006,LHV=43.0", 1.0, IPCC },
  { "fuel-oil", "mass:C=0.8534,H=0.1107,S=0.025,N=0.004,O=0.0049,ash=0.0005,water=0.0015,LHV=40.4", 1.0, IPCC },
  { "anthracite", "mass:C=0.7163,H=0.0265,O=0.0282,N=0.01,S=0.008,ash=0.171,water=0.04,LHV=26.7", 1.0, IPCC },
  { "hard-coal", "mass:C=0.6661,H=0.0445,O=0.0824,N=0.013,S=0.008,ash=0.116,water=0.07,LHV=25.8", 1.0, IPCC },
  { "sub-bituminous-coal", "mass:C=0.4957,H=0.0350,O=0.1353,N=0.008,S=0.004,ash=0.072,water=0.25,LHV=18.9", 1.0, IPCC },
  { "lignite", "mass:C=0.3280,H=0.0250,O=0.1130,N=0.004,S=0.005,ash=0.055,water=0.47,LHV=11.9", 1.0, IPCC },
  { "municipal-waste", "mass:C=0.2750,H=0.0370,O=0.1650,N=0.006,S=0.001,Cl=0.005,ash=0.231,water=0.28,LHV=10.2", 0.5,
    "analysis and heating value: common practice, no source; half of the carbon taken as fossil" },
  { "wood", "mass:C=0.4768,H=0.0520,O=0.3592,N=0.002,ash=0.01,water=0.1,LHV=15.6", 0.0, IPCC },
  { "wood-chips", "mass:C=0.2750,H=0.0330,O=0.2365,N=0.0015,ash=0.004,water=0.45,LHV=9.076", 0.0,
    "18.5 MJ/kg dry at 45 % moisture; analysis: common practice, no source" },
  { "wood-pellets", "mass:C=0.4650,H=0.0560,O=0.3940,N=0.002,ash=0.005,water=0.078,LHV=17.0", 0.0, "analysis and heating value: common practice, no source" },
  { "methanol", "mole:CH3OH(l)=1", 1.0, PURE },
  { "ethanol", "mole:C2H5OH(l)=1", 0.0, PURE },
};
const guint hl_n_named_fuels = G_N_ELEMENTS (hl_named_fuels);
