/* Liquids by polynomials over temperature, from the inside.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#pragma once
#include "fluid/fluid-private.h"
#include "fluid/liquid.h"
G_BEGIN_DECLS

#define HL_LIQUID_MAX_TERMS 8
#define HL_LIQUID_P0 101325.0         /* where h and s are those of the heat capacity alone [Pa] */
#define HL_LIQUID_T0 273.15           /* zero of h and s [K] */

/* a[0] + a[1] x + ... */
typedef struct { guint n; double a[HL_LIQUID_MAX_TERMS]; } HlPolynomial;

typedef struct {
  HlFluid      fluid;
  char        *source, *note;
  HlPolynomial density;               /* of x = (T - 273.15 K)/100 K [kg/m3] */
  HlPolynomial cp;                    /* the same [J/(kg K)] */
  HlPolynomial conductivity;          /* the same [W/(m K)] */
  HlPolynomial ln_viscosity;          /* of 1000 K/T, of the viscosity in Pa s */
  double       s_of_T[HL_LIQUID_MAX_TERMS];   /* cp as a polynomial of T, for the integral of cp/T */
} HlLiquid;

static inline const HlLiquid *
hl_liquid_of (const HlFluid *fluid)
{
  return fluid->data;
}

HlLiquid      *hl_liquid_read   (const char *text, gssize length, const char *where, GError **error);   /* NULL with error */
void           hl_liquid_free   (HlLiquid *liquid);
gboolean       hl_liquid_is_file (const char *text, gssize length);      /* the text says that it describes one */
const HlFluid *hl_liquid_lookup (const char *id);
void           hl_liquid_list   (GPtrArray *ids);                        /* appends those of the library and of the user */
const HlFluid *hl_liquid_keep   (HlLiquid *liquid, const char *where, GError **error);    /* takes it; NULL where the id is taken */

HlStatus hl_liquid_state_pT (const HlFluid *fluid, double p, double T, HlState *state);
HlStatus hl_liquid_state_ph (const HlFluid *fluid, double p, double h, HlState *state);
HlStatus hl_liquid_state_ps (const HlFluid *fluid, double p, double s, HlState *state);
HlStatus hl_liquid_state_hs (const HlFluid *fluid, double h, double s, HlState *state);
HlStatus hl_liquid_no_state (const HlFluid *fluid, double a, double b, HlState *state);
HlStatus hl_liquid_no_saturation (const HlFluid *fluid, double a, HlSaturation *saturation);
char    *hl_liquid_explain_failure (const HlFluid *fluid, HlStatus status, const char *pair, double a, double b);
double   hl_liquid_viscosity    (const HlLiquid *liquid, double T);      /* [Pa s] */
double   hl_liquid_conductivity (const HlLiquid *liquid, double T);      /* [W/(m K)] */

static inline double
hl_polynomial (const HlPolynomial *polynomial, double x)
{
  double sum = 0.0;
  for (guint i = polynomial->n; i-- > 0;)
    sum = sum * x + polynomial->a[i];
  return sum;
}

G_END_DECLS
