/* Fluids by an equation of state in the Helmholtz energy: coefficients in the form that is evaluated, and the pieces that its calls share.  SI throughout.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#pragma once
#include "fluid/fluid-private.h"
G_BEGIN_DECLS

#define HL_HELMHOLTZ_MAX_TERMS 128       /* of one kind; the reader refuses more */
#define HL_HELMHOLTZ_MAX_POWER 16        /* highest whole power in exp(-delta^l) */

/* One part of alpha(delta, tau) with its derivatives, each times the powers of
 * delta and tau that make it a pure number: d = delta alpha_delta, dt = delta
 * tau alpha_delta_tau and so on. */
typedef struct {
  double a, d, t, dd, dt, tt;
} HlAlpha;

/* n delta^d tau^t exp(-delta^l); l = 0: no exponential.  Columns of equal length. */
typedef struct {
  guint   n_terms;
  double *n, *d, *t;
  guint8 *l;
} HlPowerTerms;

/* n delta^d tau^t exp(-g delta^l - k tau^m); g or k = 0: that part is absent. */
typedef struct {
  double n, d, t, g, l, k, m;
} HlExponentialTerm;

/* n delta^d tau^t exp(-eta (delta-epsilon)^2 - beta (tau-gamma)^2) */
typedef struct {
  double n, d, t, eta, epsilon, beta, gamma;
} HlGaussianTerm;

/* n delta^d tau^t exp(eta (delta-epsilon)^2 + 1/(beta (tau-gamma)^2 + b)) */
typedef struct {
  double n, d, t, eta, epsilon, beta, gamma, b;
} HlGaoTerm;

/* n Delta^b delta exp(-C (delta-1)^2 - D (tau-1)^2), IAPWS R6-95, Table 1, terms 55 and 56 */
typedef struct {
  double n, a, b, beta, A, B, C, D;
} HlNonAnalyticTerm;

/* n ln(c + d exp(t tau)); the Planck-Einstein term n ln(1 - exp(-t tau)) is c = 1, d = -1, t = -t. */
typedef struct {
  double n, c, d, t;
} HlPlanckTerm;

typedef struct {
  double n, t;
} HlTauTerm;

/* Start of a saturated density: theta = 1 - T/T_r, S = sum n theta^t. */
typedef struct {
  enum { HL_START_LINEAR, HL_START_EXP, HL_START_EXP_TAU } form;
  double     T, density;
  guint      n_terms;
  HlTauTerm *terms;
} HlDensityStart;

/* Saturated states along zeta = sqrt(1 - T/Tc), in which densities are smooth up
 * to the critical point: cubic pieces between nodes that were solved exactly.  They
 * give starts and decide phases far from the line; answers come from the equation. */
typedef enum { HL_SAT_LN_P, HL_SAT_LN_D_LIQUID, HL_SAT_LN_D_VAPOUR, HL_SAT_H_LIQUID, HL_SAT_H_VAPOUR, HL_SAT_S_LIQUID, HL_SAT_S_VAPOUR,
               HL_N_SAT } HlSatColumn;
#define HL_SAT_NODES 176
typedef struct {
  double zeta[HL_SAT_NODES], ln_p[HL_SAT_NODES];
  /* ln p and ln d'' are kept as T/Tc times their distance from the critical value, which is nearly straight down to the triple point. */
  double y[HL_N_SAT][HL_SAT_NODES], slope[HL_N_SAT][HL_SAT_NODES];
} HlSaturationTable;

/* States on some isobars from the critical pressure up, as starts of (p,h) and (p,s). */
#define HL_START_LEVELS 12
#define HL_START_STEPS 48
typedef struct {
  guint  n_levels;
  double ln_p[HL_START_LEVELS];
  double h[HL_START_LEVELS][HL_START_STEPS + 1], s[HL_START_LEVELS][HL_START_STEPS + 1];
  double T[HL_START_LEVELS][HL_START_STEPS + 1], v[HL_START_LEVELS][HL_START_STEPS + 1];
} HlStartTable;

/* Isobars below the critical pressure, helmholtz-grid.c. */
typedef struct _HlStartGrid HlStartGrid;

typedef struct {
  HlFluid fluid;                         /* its data points back to this record */
  char   *source, *formula, *cas, *note, *safety_class, *safety_source, *zero, *gwp_source, *hazard, *stable_source;
  GStrv   aliases;
  double  gwp100, T_stable;              /* NaN where not known */
  gboolean is_stable_weak;
  double  acentric_factor;
  double  R;                             /* gas constant over molar mass [J/(kg K)] */
  double  d_reducing, T_reducing;        /* [kg/m3], [K] */
  double  Tc, pc, dc;                    /* critical point of the equation itself */
  double  T_min, T_max, p_max, p_min_sat;

  double        ideal_a1, ideal_a2, ideal_log;     /* ln(delta) + a1 + a2 tau + log ln(tau) */
  guint         n_ideal_power, n_planck;
  HlTauTerm    *ideal_power;
  HlPlanckTerm *planck;

  HlPowerTerms       power;
  guint              power_l_max;
  guint              n_exponential, n_gaussian, n_gao, n_non_analytic;
  HlExponentialTerm *exponential;
  HlGaussianTerm    *gaussian;
  HlGaoTerm         *gao;
  HlNonAnalyticTerm *non_analytic;

  HlDensityStart    start_liquid, start_vapour;
  HlSaturationTable sat;
  HlStartTable      start;
  HlStartGrid     **grid;                /* of its own; NULL inside until first needed */
} HlHelmholtz;

/* Both saturated densities at one temperature. */
typedef struct {
  double T, p, d_liquid, d_vapour;
} HlSaturatedPair;

/* Which part of an isotherm a density is sought on. */
typedef enum { HL_BRANCH_LIQUID, HL_BRANCH_VAPOUR, HL_BRANCH_ABOVE } HlBranch;

/* On which side of the range an inverse call left it. */
typedef enum { HL_SIDE_NONE, HL_SIDE_COLD, HL_SIDE_HOT, HL_SIDE_PRESSURE } HlSide;

/* What is held beside the pressure. */
typedef enum { HL_HELD_H, HL_HELD_S } HlHeld;

static inline const HlHelmholtz *
hl_helmholtz_of (const HlFluid *fluid)
{
  return fluid->data;
}

/* helmholtz-terms.c */
void hl_helmholtz_residual (const HlHelmholtz *eq, double delta, double tau, HlAlpha *alpha);
void hl_helmholtz_ideal    (const HlHelmholtz *eq, double tau, HlAlpha *alpha);       /* without ln(delta) */

/* helmholtz-state.c */
void hl_helmholtz_state    (const HlHelmholtz *eq, double density, double T, HlState *state);   /* one phase; phase is not set */
void hl_helmholtz_state_with (const HlHelmholtz *eq, double density, double T, const HlAlpha *ideal_part, HlState *state);      /* the ideal part at T is known */
void hl_helmholtz_pressure (const HlHelmholtz *eq, double density, double T, double *p, double *p_d);
HlPhase hl_helmholtz_phase (const HlHelmholtz *eq, double p, double T, gboolean is_liquid);

/* helmholtz-density.c */
HlStatus hl_helmholtz_density   (const HlHelmholtz *eq, double p, double T, HlBranch branch, double *density);
HlStatus hl_helmholtz_state_pT  (const HlFluid *fluid, double p, double T, HlState *state);
HlStatus hl_helmholtz_state_dT  (const HlFluid *fluid, double density, double T, HlState *state);

/* helmholtz-saturation-table.c */
gboolean hl_helmholtz_build_saturation (HlHelmholtz *eq, double *T_failed);
double   hl_helmholtz_zeta_of_T (const HlHelmholtz *eq, double T);
double   hl_helmholtz_zeta_of_p (const HlHelmholtz *eq, double p);        /* p between p_min_sat and pc */
double   hl_helmholtz_T_of_zeta (const HlHelmholtz *eq, double zeta);
double   hl_helmholtz_table     (const HlHelmholtz *eq, HlSatColumn column, double zeta);

/* helmholtz-saturation.c */
HlStatus hl_helmholtz_saturate_T (const HlHelmholtz *eq, double T, HlSaturatedPair *pair);
HlStatus hl_helmholtz_saturate_p (const HlHelmholtz *eq, double p, HlSaturatedPair *pair);
gboolean hl_helmholtz_polish_T   (const HlHelmholtz *eq, HlSaturatedPair *pair, guint max_steps);  /* equal p and g at pair->T from its densities */
void     hl_helmholtz_saturation_from_pair (const HlHelmholtz *eq, const HlSaturatedPair *pair, HlSaturation *saturation);
HlStatus hl_helmholtz_saturation_at (const HlHelmholtz *eq, double p, double zeta, HlSaturation *saturation);
void     hl_helmholtz_mix (const HlSaturation *saturation, double x, HlState *state);
HlStatus hl_helmholtz_saturation_p (const HlFluid *fluid, double p, HlSaturation *saturation);
HlStatus hl_helmholtz_saturation_T (const HlFluid *fluid, double T, HlSaturation *saturation);
HlStatus hl_helmholtz_state_px (const HlFluid *fluid, double p, double x, HlState *state);
HlStatus hl_helmholtz_state_Tx (const HlFluid *fluid, double T, double x, HlState *state);

/* helmholtz-inverse.c */
HlStatus hl_helmholtz_from_p (const HlHelmholtz *eq, double p, HlHeld held, double value, HlState *state, HlSide *side);
HlStatus hl_helmholtz_state_ph (const HlFluid *fluid, double p, double h, HlState *state);
HlStatus hl_helmholtz_state_ps (const HlFluid *fluid, double p, double s, HlState *state);
void     hl_helmholtz_build_starts (HlHelmholtz *eq);

/* Weights of Lagrange's cubic at y through nodes at x[0] to x[3]. */
static inline void
hl_lagrange_weights (const double x[4], double y, double w[4])
{
  for (guint i = 0; i < 4; i++)
    {
      w[i] = 1.0;
      for (guint k = 0; k < 4; k++)
        if (k != i)
          w[i] *= (y - x[k]) / (x[i] - x[k]);
    }
}

/* helmholtz-grid.c */
gboolean hl_helmholtz_grid_start (const HlHelmholtz *eq, double p, double zeta, HlHeld held, double value, gboolean is_liquid, double *T, double *v);

/* helmholtz-hs.c */
HlStatus hl_helmholtz_state_hs (const HlFluid *fluid, double h, double s, HlState *state);

/* helmholtz-explain.c */
char *hl_helmholtz_explain_failure (const HlFluid *fluid, HlStatus status, const char *pair, double a, double b);

/* helmholtz-read.c */
HlHelmholtz *hl_helmholtz_read (const char *text, gssize length, const char *where, GError **error);

/* helmholtz-fluid.c */
gboolean     hl_helmholtz_prepare (HlHelmholtz *eq, const char *where, GError **error);
HlHelmholtz *hl_helmholtz_with_reference (const HlHelmholtz *eq, HlReference reference, const char *id);
void         hl_helmholtz_free (HlHelmholtz *eq);

G_END_DECLS
