/* What every working fluid can answer.  SI throughout.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#pragma once
#include <glib.h>
G_BEGIN_DECLS

#define HL_PUBLIC __attribute__ ((visibility ("default")))

typedef struct _HlFluid HlFluid;

typedef enum {
  HL_OK,
  HL_OUTSIDE_RANGE,     /* an argument lies outside the fluid's published range */
  HL_NOT_CONVERGED,     /* an iteration ran out of steps */
} HlStatus;

typedef enum {
  HL_PHASE_LIQUID,
  HL_PHASE_TWO_PHASE,
  HL_PHASE_VAPOUR,          /* below the critical pressure, or below the critical temperature with p < psat */
  HL_PHASE_SUPERCRITICAL,   /* above the critical pressure and temperature */
  HL_PHASE_GAS,             /* of a medium that has no saturation line, see hl_fluid_has_dome() */
} HlPhase;

/* A complete state.  In the two-phase region cp, cv and w are NaN, and the
 * derivatives are those of the equilibrium mixture as the formulation gives it:
 * where its saturation line is not exactly consistent (IF97: 1e-5 in s_h, up to
 * 1e-3 in s_p) they follow its functions, not the thermodynamic identities. */
typedef struct {
  double  p, T;             /* pressure [Pa], temperature [K] */
  double  h, s, v, u;       /* specific enthalpy [J/kg], entropy [J/(kg K)], volume [m3/kg], internal energy [J/kg] */
  double  cp, cv, w;        /* heat capacities [J/(kg K)], speed of sound [m/s] */
  double  x;                /* vapour mass fraction [-]; NaN where there is one phase; 0 and 1 on the saturation line
                             * when the call asked for it by (p,x) or (T,x) */
  double  T_p, T_h;         /* dT/dp at constant h [K/Pa], dT/dh at constant p [K kg/J] */
  double  s_p, s_h;         /* the same for entropy; in one phase s_h = 1/T, s_p = -v/T */
  double  v_p, v_h;         /* the same for specific volume */
  HlPhase phase;
} HlState;

/* Both ends of the saturation line at one pressure, with derivatives along the line. */
typedef struct {
  double p, T, T_p;                       /* T_p = dTsat/dp [K/Pa] */
  double h_liquid, s_liquid, v_liquid;
  double h_vapour, s_vapour, v_vapour;
  double h_liquid_p, h_vapour_p;          /* dh'/dp, dh''/dp [J/(kg Pa)] */
  double s_liquid_p, s_vapour_p;          /* ds'/dp, ds''/dp [J/(kg K Pa)] */
  double v_liquid_p, v_vapour_p;
} HlSaturation;

typedef struct {
  double p_min, p_max, T_min, T_max;      /* outer box of the published range [Pa], [K]; p_min 0: every p above 0 */
  double p_critical, T_critical, v_critical;        /* NaN where the medium has no dome */
  double p_triple, T_triple;                        /* the same */
  double molar_mass;                      /* [kg/mol] */
} HlFluidLimits;

/* Which state has the zero of enthalpy and entropy; only differences within one circuit mean anything. */
typedef enum {
  HL_REFERENCE_PUBLISHED,   /* as the authors' constants give it */
  HL_REFERENCE_IIR,         /* h = 200 kJ/kg, s = 1 kJ/(kg K): saturated liquid at 273.15 K */
  HL_REFERENCE_NBP,         /* h = s = 0: saturated liquid at 101325 Pa */
  HL_REFERENCE_ASHRAE,      /* h = s = 0: saturated liquid at 233.15 K */
} HlReference;

#define HL_FLUID_ERROR (hl_fluid_error_quark ())
HL_PUBLIC GQuark hl_fluid_error_quark (void);
typedef enum {
  HL_FLUID_ERROR_FILE,      /* a coefficient file is not right */
  HL_FLUID_ERROR_ID,        /* no medium has this id */
  HL_FLUID_ERROR_GAS,       /* a composition that is none */
  HL_FLUID_ERROR_FUEL,      /* a fuel that is none, or does not burn */
} HlFluidError;

/* Fluids live as long as the program and are immutable: every call may run in any thread.
 * Out parameters are untouched on failure. */
HL_PUBLIC const HlFluid *hl_fluid_lookup      (const char *id);         /* "water", "r134a@IIR", "gas:N2=0.8,O2=0.2"; NULL when unknown */
HL_PUBLIC const HlFluid *hl_fluid_find        (const char *id, GError **error);     /* the same, and why there is none */
HL_PUBLIC const HlFluid *hl_fluid_with_reference (const HlFluid *fluid, HlReference reference);
HL_PUBLIC const HlFluid *hl_fluid_load_file   (const char *path, GError **error);   /* the user's own coefficients */
HL_PUBLIC char         **hl_fluid_list        (void);                   /* ids of all; free with g_strfreev() */
HL_PUBLIC const HlFluid *hl_fluid_water       (void);                   /* IAPWS-IF97 */
HL_PUBLIC const char    *hl_fluid_id          (const HlFluid *fluid);
HL_PUBLIC const char    *hl_fluid_name        (const HlFluid *fluid);   /* English name, translatable by the caller */
HL_PUBLIC const char    *hl_fluid_formulation (const HlFluid *fluid);   /* "IAPWS-IF97, R7-97(2012)" */
HL_PUBLIC void           hl_fluid_limits      (const HlFluid *fluid, HlFluidLimits *limits);
HL_PUBLIC gboolean       hl_fluid_has_dome    (const HlFluid *fluid);   /* saturation line and critical point; FALSE for ideal gases */

HL_PUBLIC HlStatus hl_fluid_state_pT (const HlFluid *fluid, double p, double T, HlState *state) G_GNUC_WARN_UNUSED_RESULT;
HL_PUBLIC HlStatus hl_fluid_state_ph (const HlFluid *fluid, double p, double h, HlState *state) G_GNUC_WARN_UNUSED_RESULT;
HL_PUBLIC HlStatus hl_fluid_state_ps (const HlFluid *fluid, double p, double s, HlState *state) G_GNUC_WARN_UNUSED_RESULT;
HL_PUBLIC HlStatus hl_fluid_state_hs (const HlFluid *fluid, double h, double s, HlState *state) G_GNUC_WARN_UNUSED_RESULT;
HL_PUBLIC HlStatus hl_fluid_state_px (const HlFluid *fluid, double p, double x, HlState *state) G_GNUC_WARN_UNUSED_RESULT;
HL_PUBLIC HlStatus hl_fluid_state_Tx (const HlFluid *fluid, double T, double x, HlState *state) G_GNUC_WARN_UNUSED_RESULT;
HL_PUBLIC HlStatus hl_fluid_state_dT (const HlFluid *fluid, double density, double T, HlState *state) G_GNUC_WARN_UNUSED_RESULT;
HL_PUBLIC HlStatus hl_fluid_saturation_p (const HlFluid *fluid, double p, HlSaturation *saturation) G_GNUC_WARN_UNUSED_RESULT;
HL_PUBLIC HlStatus hl_fluid_saturation_T (const HlFluid *fluid, double T, HlSaturation *saturation) G_GNUC_WARN_UNUSED_RESULT;

HL_PUBLIC const char *hl_status_describe (HlStatus status);
HL_PUBLIC const char *hl_phase_name      (HlPhase phase);               /* "liquid", "two-phase", "vapour", "supercritical", "gas" */

/* A sentence that names the limit which the pair of arguments breaks, for
 * instance "1200 bar is above 1000 bar, the highest pressure of IAPWS-IF97";
 * pair is "pT", "ph", "ps", "hs", "px", "Tx" or "dT" (density in kg/m3).  Free with g_free(). */
HL_PUBLIC char *hl_fluid_explain_failure (const HlFluid *fluid, HlStatus status, const char *pair, double a, double b);
G_END_DECLS
