/* Ideal-gas mixtures from the inside: species, aggregated polynomials, states of one and two phases.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#pragma once
#include "fluid/fluid-private.h"
#include "fluid/gas.h"
G_BEGIN_DECLS

#define HL_GAS_MAX_SPECIES 24
#define HL_GAS_P0 1e5                 /* pressure of the standard state [Pa] */
#define HL_GAS_P_MAX 10e6             /* beyond it the ideal gas is too far from the truth [Pa] */
#define HL_GAS_T_BREAK 1000.0         /* where the two stretches of every polynomial meet [K] */
#define HL_GAS_T_ICE 273.15           /* below it water freezes out [K] */
#define HL_GAS_H_LIQUID_WATER -285.830e3      /* enthalpy of formation at 298.15 K [J/mol], CODATA 1989 */
#define HL_GAS_MAX_WATER 0.95         /* mole fraction of water above which the medium is steam */

typedef enum { HL_ATOM_H, HL_ATOM_C, HL_ATOM_N, HL_ATOM_O, HL_ATOM_S, HL_ATOM_CL, HL_ATOM_AR, HL_ATOM_HE, HL_N_ATOMS } HlAtom;

/* cp = a0 + a1 T + ..., h and s by its integrals with the constants a5 and a6. */
typedef struct { double a[2][7]; } HlGasPolynomial;

typedef struct {
  char  *formula, *name;
  double M;                           /* [kg/mol] */
  double T_low, T_high;               /* [K] */
  guint  atoms[HL_N_ATOMS];
  HlGasPolynomial molar;              /* of cp/R, h/R, s/R */
} HlGasSpecies;

typedef struct {
  char  *id, *name, *note;
  double y[HL_GAS_MAX_SPECIES];
} HlGasNamed;

typedef struct {
  double       R;                     /* [J/(mol K)], that of the coefficients */
  double       atomic_mass[HL_N_ATOMS];       /* [kg/mol] */
  char        *source;
  guint        n_species, n_named;
  guint        water;                 /* index of H2O */
  HlGasSpecies species[HL_GAS_MAX_SPECIES];
  HlGasNamed   named[8];
} HlGasData;

/* All per kg of the whole mixture, condensed water included. */
typedef struct {
  HlFluid fluid;
  double  y[HL_GAS_MAX_SPECIES];      /* mole fractions with all water as vapour, sum 1 */
  double  M, R;                       /* [kg/mol], [J/(kg K)] */
  double  n_dry, n_water;             /* [mol/kg] */
  double  y_water;
  HlGasPolynomial whole, dry;         /* [J/(kg K)], [J/kg]; the entropy of mixing is in a6 */
} HlGas;

static inline const HlGas *
hl_gas_of (const HlFluid *fluid)
{
  return fluid->data;
}

/* The species and mixtures that the library carries, read once. */
const HlGasData *hl_gas_data (void);
int              hl_gas_find_species (const HlGasData *data, const char *formula, gsize length);   /* -1 when unknown */

gboolean       hl_gas_is_mixture (const HlFluid *fluid);
const HlFluid *hl_gas_lookup     (const char *id, GError **error);    /* NULL without error where @id is none of a gas */
void           hl_gas_list       (GPtrArray *ids);                    /* appends the named ones */

/* An ideal part at T: enthalpy, entropy at 1 bar, heat capacity. */
typedef struct { double h, s, cp; } HlGasIdeal;

static inline double
hl_gas_cp (const HlGasPolynomial *polynomial, double T)
{
  const double *a = polynomial->a[T > HL_GAS_T_BREAK];
  return a[0] + T * (a[1] + T * (a[2] + T * (a[3] + T * a[4])));
}

static inline double
hl_gas_h (const HlGasPolynomial *polynomial, double T)
{
  const double *a = polynomial->a[T > HL_GAS_T_BREAK];
  return a[5] + T * (a[0] + T * (a[1] / 2.0 + T * (a[2] / 3.0 + T * (a[3] / 4.0 + T * (a[4] / 5.0)))));
}

static inline double
hl_gas_s (const HlGasPolynomial *polynomial, double T, double ln_T)
{
  const double *a = polynomial->a[T > HL_GAS_T_BREAK];
  return a[6] + a[0] * ln_T + T * (a[1] + T * (a[2] / 2.0 + T * (a[3] / 3.0 + T * (a[4] / 4.0))));
}

/* What the flashes need of a state with liquid water: values and slopes at constant p. */
typedef struct { double h, s, h_T, s_T; } HlGasWet;

/* gas-wet.c: below the dew point; p above psat(T), T at least 273.15 K. */
void     hl_gas_wet_state  (const HlGas *gas, double p, double T, HlState *state);
void     hl_gas_wet_values (const HlGas *gas, double p, double T, HlGasWet *wet);
gboolean hl_gas_is_wet     (const HlGas *gas, double p, double T);        /* water condenses, T at least 273.15 K */
gboolean hl_gas_is_icy     (const HlGas *gas, double p, double T);        /* water would freeze out, T below 273.15 K */
double   hl_gas_dew_T      (const HlGas *gas, double p);                  /* meaningful above 273.15 K only */
double   hl_gas_ice_pressure (double T);                                  /* of ice: R14-08(2011) [Pa] */

/* gas-state.c */
HlStatus hl_gas_state_pT (const HlFluid *fluid, double p, double T, HlState *state);
HlStatus hl_gas_state_ph (const HlFluid *fluid, double p, double h, HlState *state);
HlStatus hl_gas_state_ps (const HlFluid *fluid, double p, double s, HlState *state);
HlStatus hl_gas_state_hs (const HlFluid *fluid, double h, double s, HlState *state);
HlStatus hl_gas_state_dT (const HlFluid *fluid, double density, double T, HlState *state);

/* gas-explain.c */
HlStatus hl_gas_no_state      (const HlFluid *fluid, double a, double b, HlState *state);
HlStatus hl_gas_no_saturation (const HlFluid *fluid, double a, HlSaturation *saturation);
char    *hl_gas_explain_failure (const HlFluid *fluid, HlStatus status, const char *pair, double a, double b);

G_END_DECLS
