/* Fuels: what they consist of and what they yield when burnt.  SI throughout.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#pragma once
#include "fluid/fluid.h"
G_BEGIN_DECLS

/* Everything per kg of fuel as fired, at 298.15 K. */
typedef struct {
  char     name[96];
  double   carbon, hydrogen, oxygen, nitrogen, sulphur, chlorine;     /* of the dry substance [kg/kg] */
  double   moisture, ash;           /* [kg/kg]; liquid water unless the fuel is a gas */
  double   lhv, hhv;                /* [J/kg] */
  double   h_formation;             /* enthalpy from the elements [J/kg], which adds up with those of gases */
  double   co2;                     /* [kg/kg] */
  double   fossil_share;            /* of its carbon, 0 to 1 */
  gboolean is_gas;
  gboolean is_lhv_estimated;        /* by a correlation from the analysis */
  const char *source;               /* of composition and heating value; NULL where the caller gave them */
} HlFuel;

/* One text for every fuel:
 *   "natural-gas"                                     a named one, see hl_fuel_list()
 *   "mole:CH4=0.9,C2H6=0.06,N2=0.04"                  components of a gas by moles
 *   "mass:C=0.6,H=0.04,O=0.08,S=0.01,ash=0.12,water=0.15,LHV=23.4"     analysis as fired [kg/kg], LHV [MJ/kg]; without
 *                                                     LHV it is estimated
 * Returns FALSE with @error set where it is none. */
HL_PUBLIC gboolean    hl_fuel_find          (const char *text, HlFuel *fuel, GError **error);
HL_PUBLIC gboolean    hl_fuel_with_moisture (const HlFuel *fuel, double moisture, HlFuel *other, GError **error);    /* same dry substance */
HL_PUBLIC char      **hl_fuel_list          (void);     /* names; free with g_strfreev() */

G_END_DECLS
