/* Complete combustion: air needed, flue gas, flame temperature.  SI throughout.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#pragma once
#include "fluid/fuel.h"
G_BEGIN_DECLS

/* Per kg of fuel as fired. */
typedef struct {
  const HlFluid *gas;               /* flue gas as a medium, all water as vapour */
  double excess_air;                /* 0.1: ten percent more than is needed */
  double air_needed, air;           /* without and with the excess [kg/kg], moisture of the air included */
  double gas_mass;                  /* [kg/kg] */
  double co2;                       /* of the fuel [kg/kg] */
  double co2_per_heat;              /* on the lower heating value [kg/J] */
  double oxygen_dry;                /* mole fraction of O2 in the dry gas */
  double co2_dry;                   /* the same of CO2 */
} HlCombustion;

/* @air is any gas with oxygen: "air", humid air, enriched air. */
HL_PUBLIC gboolean hl_combustion (const HlFuel *fuel, const HlFluid *air, double excess_air, HlCombustion *combustion, GError **error);
/* The excess from the oxygen measured in the dry flue gas, as a mole fraction. */
HL_PUBLIC gboolean hl_combustion_excess_of_oxygen (const HlFuel *fuel, const HlFluid *air, double oxygen_dry, double *excess_air, GError **error);
/* Adiabatic, at constant pressure, without dissociation and without the ash's heat; fuel at 298.15 K. */
HL_PUBLIC HlStatus hl_combustion_flame (const HlFuel *fuel, const HlFluid *air, const HlCombustion *combustion, double p, double T_air, HlState *flame) G_GNUC_WARN_UNUSED_RESULT;

G_END_DECLS
