/* The zones of a closed feedwater heater: desuperheating, condensing, subcooling.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#pragma once
#include "engine/equations.h"
G_BEGIN_DECLS

enum { HL_ZONE_DESUPERHEATING, HL_ZONE_CONDENSING, HL_ZONE_SUBCOOLING, HL_N_ZONES };

/* Shell: pressure, steam flow and enthalpy, drain flow and enthalpy.  Feed: flow, and pressure and enthalpy at both ends.
 * Pressures are carried as logarithms. */
enum { HL_ZONES_P, HL_ZONES_M_STEAM, HL_ZONES_H_STEAM, HL_ZONES_M_DRAIN, HL_ZONES_H_DRAIN,
       HL_ZONES_M_FEED, HL_ZONES_P_IN, HL_ZONES_H_IN, HL_ZONES_P_OUT, HL_ZONES_H_OUT, HL_N_ZONE_INPUTS };

typedef struct {
  double heat[HL_N_ZONES];
  double hot_in[HL_N_ZONES], hot_out[HL_N_ZONES];       /* shell temperatures along the condensing side's flow [K] */
  double feed_in[HL_N_ZONES], feed_out[HL_N_ZONES];     /* feedwater temperatures along its flow [K] */
  double conductance[HL_N_ZONES];
} HlHeaterZones;

HlStatus    hl_heater_zones (const HlFluid *shell, const HlFluid *feed, const double inputs[HL_N_ZONE_INPUTS], HlHeaterZones *zones);
/* conductance = sum over the zones of heat over logarithmic mean difference; variables in the order above, then UA. */
HlEquation *hl_add_heater_conductance (HlSystem *system, const HlFluid *shell, const HlFluid *feed, const int inputs[HL_N_ZONE_INPUTS], int conductance);
G_END_DECLS
