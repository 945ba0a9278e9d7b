/* Temperature, pressure and enthalpy of one state, whichever of them is sought: also where the state may be wet.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "engine/equations.h"
#include "plant/i18n.h"
#include <math.h>

#define WEIGHT    8.0       /* how strongly the wrong side of saturation counts */
#define HEAT      3000.0    /* [J/(kg K)]: makes an enthalpy of a temperature difference, for the residual's scale alone */

/* T(p,h) = T, made such that Newton's method finds its way out of the wet region, where T does not depend on h: there, and on the
 * far side of it, the distance to saturation counts once more, weighted by the way through.  The sum is continuous, rises with h,
 * and is zero where and only where T(p,h) = T.  Derivatives to ln p, h, T. */
static HlStatus
condition (const HlFluid *fluid, double ln_p, double h, double T, double *r, double *to_p, double *to_h, double *to_T)
{
  HlState st;
  HlSaturation sat;
  double p = exp (ln_p);
  HlStatus status = hl_fluid_state_ph (fluid, p, h, &st);
  if (status != HL_OK)
    return status;
  *r = st.T - T;
  *to_p = st.T_p * p;
  *to_h = st.T_h;
  *to_T = -1.0;
  if (hl_fluid_saturation_p (fluid, p, &sat) != HL_OK)
    return HL_OK;
  double latent = sat.h_vapour - sat.h_liquid, off = sat.T - T;
  double way = latent > 0.0 ? (off < 0.0 ? sat.h_vapour - h : h - sat.h_liquid) / latent : 0.0;
  if (way <= 0.0)
    return HL_OK;
  if (way >= 1.0)
    {
      *r += WEIGHT * off;
      *to_p += WEIGHT * sat.T_p * p;
      *to_T -= WEIGHT;
      return HL_OK;
    }
  double way_p = ((off < 0.0 ? sat.h_vapour_p : -sat.h_liquid_p) - way * (sat.h_vapour_p - sat.h_liquid_p)) / latent;
  *r = off * (1.0 + WEIGHT * way);
  *to_p = (sat.T_p * (1.0 + WEIGHT * way) + off * WEIGHT * way_p) * p;
  *to_h = off * WEIGHT * (off < 0.0 ? -1.0 : 1.0) / latent;
  *to_T = -1.0 - WEIGHT * way;
  return HL_OK;
}

/* --- the temperature drives: h = h(p,T) ------------------------------------ */

static HlStatus
enthalpy_at_temperature (const HlEquation *e, G_GNUC_UNUSED const double *a, const double *x, double *r, double *dr)
{
  HlState st;
  double p = exp (x[0]);
  HlStatus status = hl_fluid_state_pT (e->fluid, p, x[1], &st);
  if (status != HL_OK)
    return status;
  *r = x[2] - st.h;
  dr[0] = st.T_p / st.T_h * p;
  dr[1] = -1.0 / st.T_h;
  dr[2] = 1.0;
  return HL_OK;
}

HlEquation *
hl_add_enthalpy_at_temperature (HlSystem *system, const HlFluid *fluid, int p, int T, int h)
{
  HlEquation *e = hl_system_add_equation (system, enthalpy_at_temperature, HL_VAR_ENTHALPY, 4, (const int[]) { p, T, h }, 3, NULL, 0);
  e->fluid = fluid;
  e->says = N_("{2} = h({0}, {1})");
  return e;
}

static HlStatus
enthalpy_condition (const HlEquation *e, G_GNUC_UNUSED const double *a, const double *x, double *r, double *dr)
{
  HlStatus status = condition (e->fluid, x[0], x[2], x[1], r, &dr[0], &dr[2], &dr[1]);
  if (status != HL_OK)
    return status;
  *r *= HEAT;
  for (int k = 0; k < 3; k++)
    dr[k] *= HEAT;
  return HL_OK;
}

HlEquation *
hl_add_enthalpy_condition (HlSystem *system, const HlFluid *fluid, int p, int T, int h)
{
  HlEquation *e = hl_add_enthalpy_at_temperature (system, fluid, p, T, h);
  e->in_block = enthalpy_condition;
  e->plain_for = 2;
  return e;
}

/* --- it is computed, T = T(p,h), unless it turns out to be known ------------ */

static HlStatus
temperature (const HlEquation *e, G_GNUC_UNUSED const double *a, const double *x, double *r, double *dr)
{
  HlState st;
  double p = exp (x[0]);
  HlStatus status = hl_fluid_state_ph (e->fluid, p, x[1], &st);
  if (status != HL_OK)
    return status;
  *r = x[2] - st.T;
  dr[0] = -st.T_p * p;
  dr[1] = -st.T_h;
  dr[2] = 1.0;
  return HL_OK;
}

static HlStatus
temperature_condition (const HlEquation *e, G_GNUC_UNUSED const double *a, const double *x, double *r, double *dr)
{
  return condition (e->fluid, x[0], x[1], x[2], r, &dr[0], &dr[1], &dr[2]);
}

HlEquation *
hl_add_temperature (HlSystem *system, const HlFluid *fluid, int p, int h, int T)
{
  HlEquation *e = hl_system_add_equation (system, temperature, HL_VAR_TEMPERATURE, 4, (const int[]) { p, h, T }, 3, NULL, 0);
  e->fluid = fluid;
  e->says = N_("{2} = T({0}, {1})");
  e->output = 2;
  e->in_block = temperature_condition;
  e->plain_for = 2;
  return e;
}
