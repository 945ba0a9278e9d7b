/* The parts of IAPWS-IF97 that only its own files and tests call.  SI throughout.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#pragma once
#include "fluid/fluid.h"
G_BEGIN_DECLS

/* R7-97(2012), section 2: reference constants of the formulation. */
#define HL_IF97_R          461.526       /* specific gas constant [J/(kg K)] */
#define HL_IF97_T_CRITICAL 647.096       /* [K] */
#define HL_IF97_P_CRITICAL 22.064e6      /* [Pa] */
#define HL_IF97_D_CRITICAL 322.0         /* [kg/m3] */

/* R7-97(2012), section 3, Figure 1: corners of the regions. */
#define HL_IF97_T_MIN      273.15
#define HL_IF97_T_13       623.15        /* regions 1 and 2 up to here, region 3 above [K] */
#define HL_IF97_T_25       1073.15       /* region 2 up to here, region 5 above [K] */
#define HL_IF97_T_MAX      2273.15
#define HL_IF97_P_MAX      100e6
#define HL_IF97_P_MAX_5    50e6          /* highest pressure of region 5 [Pa] */
#define HL_IF97_P_MIN_SAT  611.2126774443  /* psat(273.15 K), Eq. 30 [Pa] */
#define HL_IF97_P_SAT_13   16.52916425260448e6  /* psat(623.15 K), Eq. 30 [Pa] */

/* Region 3: the Helmholtz function's derivatives as pressures and heats. */
typedef struct { double p, h, s, cv, p_d, p_T; } HlIf97Helmholtz;

/* Single-phase properties; all of the state but the phase; x becomes NaN. */
void hl_if97_region1            (double p, double T, HlState *state);
void hl_if97_region2            (double p, double T, HlState *state);
void hl_if97_region2_metastable (double p, double T, HlState *state);
void hl_if97_region3            (double density, double T, HlState *state);
void hl_if97_region5            (double p, double T, HlState *state);

/* The same at the temperature where h [J/kg] or s [J/(kg K)] has the value; T
 * is near to it, within some 30 mK.  Returns about the relative error left in
 * the derivatives; where that is more than most_left (below 1e-8), the state is untouched
 * and the start was too far off. */
double hl_if97_region1_at_h (double p, double T, double h, double most_left, HlState *state);
double hl_if97_region1_at_s (double p, double T, double s, double most_left, HlState *state);
double hl_if97_region2_at_h (double p, double T, double h, double most_left, HlState *state);
double hl_if97_region2_at_s (double p, double T, double s, double most_left, HlState *state);
double hl_if97_region5_at_h (double p, double T, double h, double most_left, HlState *state);
double hl_if97_region5_at_s (double p, double T, double s, double most_left, HlState *state);

/* h or s alone with the heat capacity cp [J/(kg K)]. */
double hl_if97_region1_enthalpy (double p, double T, double *cp);
double hl_if97_region1_entropy  (double p, double T, double *cp);
double hl_if97_region2_enthalpy (double p, double T, double *cp);
double hl_if97_region2_entropy  (double p, double T, double *cp);
double hl_if97_region5_enthalpy (double p, double T, double *cp);
double hl_if97_region5_entropy  (double p, double T, double *cp);

void hl_if97_region3_helmholtz (double density, double T, HlIf97Helmholtz *helmholtz);

/* Region 3 with other pairs, by iteration on its equation. */
HlStatus hl_if97_region3_density_pT (double p, double T, double start, double *density);
HlStatus hl_if97_region3_ph (double p, double h, double density, double T, HlState *state);
HlStatus hl_if97_region3_ps (double p, double s, double density, double T, HlState *state);

/* Saturation line, Eqs. 30 and 31. */
double hl_if97_psat   (double T);
double hl_if97_psat_T (double T, double *p_T);       /* with the slope dp/dT */
double hl_if97_Tsat   (double p);

/* Boundaries: R7-97 Eqs. 5, 6, 20, 21; SR2-01 Eq. 2; SR3-03 Eqs. 1, 10, 11; SR4-04 Eqs. 3 to 9. */
double hl_if97_B23_p    (double T);
double hl_if97_B23_T    (double p);
double hl_if97_B2bc_p   (double h);
double hl_if97_B2bc_h   (double p);
double hl_if97_B2ab_h   (double s);
double hl_if97_B3ab_h   (double p);
double hl_if97_psat3_h  (double h);
double hl_if97_psat3_s  (double s);
double hl_if97_h_liquid_1   (double s);
double hl_if97_h_liquid_3a  (double s);
double hl_if97_h_vapour_2ab (double s);
double hl_if97_h_vapour_2c3b (double s);
double hl_if97_B13_h    (double s);
double hl_if97_B23_T_hs (double h, double s);
double hl_if97_Tsat_hs  (double h, double s);

/* Backward equations, unpolished: starting values only. */
double hl_if97_T_ph_1  (double p, double h);
double hl_if97_T_ph_2a (double p, double h);
double hl_if97_T_ph_2b (double p, double h);
double hl_if97_T_ph_2c (double p, double h);
double hl_if97_T_ps_1  (double p, double s);
double hl_if97_T_ps_2a (double p, double s);
double hl_if97_T_ps_2b (double p, double s);
double hl_if97_T_ps_2c (double p, double s);
double hl_if97_p_hs_1  (double h, double s);
double hl_if97_p_hs_2a (double h, double s);
double hl_if97_p_hs_2b (double h, double s);
double hl_if97_p_hs_2c (double h, double s);
double hl_if97_p_hs_3a (double h, double s);
double hl_if97_p_hs_3b (double h, double s);
double hl_if97_T_ph_3a (double p, double h);
double hl_if97_T_ph_3b (double p, double h);
double hl_if97_v_ph_3a (double p, double h);
double hl_if97_v_ph_3b (double p, double h);
double hl_if97_T_ps_3a (double p, double s);
double hl_if97_T_ps_3b (double p, double s);
double hl_if97_v_ps_3a (double p, double s);
double hl_if97_v_ps_3b (double p, double s);

/* SR5-05: v(p,T) in the subregions 3a to 3z. */
typedef enum {
  HL_IF97_3AB, HL_IF97_3CD, HL_IF97_3EF, HL_IF97_3GH, HL_IF97_3IJ, HL_IF97_3JK, HL_IF97_3MN,
  HL_IF97_3OP, HL_IF97_3QU, HL_IF97_3RX, HL_IF97_3UV, HL_IF97_3WX,
} HlIf97Boundary3;
double hl_if97_boundary3 (HlIf97Boundary3 boundary, double p);        /* T [K] */
char   hl_if97_subregion3 (double p, double T);                       /* 'a' to 'z' */
double hl_if97_v_pT_3 (char subregion, double p, double T);           /* [m3/kg] */

G_END_DECLS
