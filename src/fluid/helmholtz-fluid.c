/* Makes fluids of coefficients: critical point, saturation table, the table of calls, other zeros of enthalpy and entropy.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "fluid/helmholtz-private.h"

#include <math.h>

void
hl_helmholtz_free (HlHelmholtz *eq)
{
  if (eq == NULL)
    return;
  g_free ((char *) eq->fluid.id);
  g_free ((char *) eq->fluid.name);
  g_free ((char *) eq->fluid.formulation);
  g_free (eq->source);
  g_free (eq->formula);
  g_free (eq->cas);
  g_free (eq->note);
  g_free (eq->zero);
  g_free (eq->safety_class);
  g_free (eq->safety_source);
  g_free (eq->gwp_source);
  g_free (eq->hazard);
  g_free (eq->stable_source);
  g_strfreev (eq->aliases);
  g_free (eq->ideal_power);
  g_free (eq->planck);
  g_free (eq->power.n);
  g_free (eq->power.d);
  g_free (eq->power.t);
  g_free (eq->power.l);
  g_free (eq->exponential);
  g_free (eq->gaussian);
  g_free (eq->gao);
  g_free (eq->non_analytic);
  if (eq->grid != NULL)
    g_free (*eq->grid);
  g_free (eq->grid);
  g_free (eq->start_liquid.terms);
  g_free (eq->start_vapour.terms);
  g_free (eq);
}

/* dp/dd over R T, and its slope in d by differences; both vanish at the critical point. */
static void
critical_misses (const HlHelmholtz *eq, double d, double T, double misses[2])
{
  double p, here, above, below, step = 1e-4 * d;
  hl_helmholtz_pressure (eq, d, T, &p, &here);
  hl_helmholtz_pressure (eq, d + step, T, &p, &above);
  hl_helmholtz_pressure (eq, d - step, T, &p, &below);
  misses[0] = here / (eq->R * T);
  misses[1] = (above - below) / (2.0 * step) * d / (eq->R * T);
}

/* A file may give the critical point as published, which is not quite where the
 * equation has its own; the top of the dome must lie on the equation. */
static gboolean
refine_critical_point (HlHelmholtz *eq)
{
  double d = eq->dc, T = eq->Tc, p, p_d;
  hl_helmholtz_pressure (eq, d, T, &p, &p_d);
  if (fabs (p_d) < 1e-6 * eq->R * T && fabs (p / eq->pc - 1.0) < 1e-9)
    return TRUE;
  for (int i = 0; i < 30; i++)
    {
      double at[2], by_d[2], by_T[2], d_step = 1e-5 * d, T_step = 1e-6 * T;
      critical_misses (eq, d, T, at);
      critical_misses (eq, d + d_step, T, by_d);
      critical_misses (eq, d, T + T_step, by_T);
      double a = (by_d[0] - at[0]) / d_step, b = (by_T[0] - at[0]) / T_step;
      double c = (by_d[1] - at[1]) / d_step, e = (by_T[1] - at[1]) / T_step;
      double det = a * e - b * c, dd = (b * at[1] - e * at[0]) / det, dT = (c * at[0] - a * at[1]) / det;
      if (!isfinite (dd) || !isfinite (dT))
        return FALSE;
      d += CLAMP (dd, -0.05 * d, 0.05 * d);
      T += CLAMP (dT, -0.01 * T, 0.01 * T);
      if (fabs (dd) < 1e-7 * d && fabs (dT) < 1e-10 * T)
        break;
    }
  hl_helmholtz_pressure (eq, d, T, &p, &p_d);
  if (!(fabs (T / eq->Tc - 1.0) < 0.01 && fabs (d / eq->dc - 1.0) < 0.2 && fabs (p / eq->pc - 1.0) < 0.05))
    return FALSE;
  eq->dc = d;
  eq->Tc = T;
  eq->pc = p;
  return TRUE;
}

static gboolean
has_heat_capacity (const HlHelmholtz *eq, double T)
{
  HlAlpha ideal;
  hl_helmholtz_ideal (eq, eq->T_reducing / T, &ideal);
  return ideal.tt < 0.0;
}

static void
fill_fluid (HlHelmholtz *eq)
{
  HlFluid *fluid = &eq->fluid;
  fluid->data = eq;
  eq->grid = g_new0 (HlStartGrid *, 1);
  fluid->limits.p_min = 0.0;
  fluid->limits.p_max = eq->p_max;
  fluid->limits.T_min = eq->T_min;
  fluid->limits.T_max = eq->T_max;
  fluid->limits.p_critical = eq->pc;
  fluid->limits.T_critical = eq->Tc;
  fluid->limits.v_critical = 1.0 / eq->dc;
  fluid->limits.p_triple = eq->p_min_sat;
  fluid->limits.T_triple = eq->T_min;
  fluid->state_pT = hl_helmholtz_state_pT;
  fluid->state_ph = hl_helmholtz_state_ph;
  fluid->state_ps = hl_helmholtz_state_ps;
  fluid->state_hs = hl_helmholtz_state_hs;
  fluid->state_px = hl_helmholtz_state_px;
  fluid->state_Tx = hl_helmholtz_state_Tx;
  fluid->state_dT = hl_helmholtz_state_dT;
  fluid->saturation_p = hl_helmholtz_saturation_p;
  fluid->saturation_T = hl_helmholtz_saturation_T;
  fluid->explain_failure = hl_helmholtz_explain_failure;
}

/**
 * hl_helmholtz_prepare:
 * @eq: coefficients that were read
 * @where: name of the file for messages
 * @error: says what is wrong, where, and how to mend it
 *
 * Finds the critical point of the equation and its saturation line, which a
 * wrong coefficient hardly ever survives, and completes the fluid.
 *
 * Returns: whether it is one
 */
gboolean
hl_helmholtz_prepare (HlHelmholtz *eq, const char *where, GError **error)
{
  double T_failed = 0.0;
  if (!has_heat_capacity (eq, eq->T_min) || !has_heat_capacity (eq, eq->T_max))
    g_set_error (error, HL_FLUID_ERROR, HL_FLUID_ERROR_FILE,
                 "%s: the ideal part gives no positive heat capacity between %g K and %g K; compare its coefficients and signs with the paper",
                 where, eq->T_min, eq->T_max);
  else if (!refine_critical_point (eq))
    g_set_error (error, HL_FLUID_ERROR, HL_FLUID_ERROR_FILE,
                 "%s: the equation has no critical point near %g K and %g Pa; compare the residual coefficients, \"reducing\" and \"critical\" with the paper",
                 where, eq->Tc, eq->pc);
  else if (!hl_helmholtz_build_saturation (eq, &T_failed))
    g_set_error (error, HL_FLUID_ERROR, HL_FLUID_ERROR_FILE,
                 "%s: the equation has no equilibrium of liquid and vapour at %g K from the densities of \"saturation_start\"; compare it and the residual coefficients with the paper",
                 where, T_failed);
  else
    {
      hl_helmholtz_build_starts (eq);
      fill_fluid (eq);
      return TRUE;
    }
  return FALSE;
}

/* Saturated liquid to which a customary zero refers. */
static HlStatus
anchor_of (const HlHelmholtz *eq, HlReference reference, double *h, double *s, HlState *anchor)
{
  *h = *s = 0.0;
  switch (reference)
    {
    case HL_REFERENCE_IIR:
      *h = 200e3;
      *s = 1e3;
      return hl_helmholtz_state_Tx (&eq->fluid, 273.15, 0.0, anchor);
    case HL_REFERENCE_ASHRAE:
      return hl_helmholtz_state_Tx (&eq->fluid, 233.15, 0.0, anchor);
    case HL_REFERENCE_NBP:
      return hl_helmholtz_state_px (&eq->fluid, 101325.0, 0.0, anchor);
    case HL_REFERENCE_PUBLISHED:
      break;
    }
  return HL_OUTSIDE_RANGE;
}

/* The same fluid with its zero of h and s moved.  Coefficients stay with the
 * original, which is never freed; NULL where the state of that zero does not exist. */
HlHelmholtz *
hl_helmholtz_with_reference (const HlHelmholtz *eq, HlReference reference, const char *id)
{
  HlState anchor;
  double h, s;
  if (anchor_of (eq, reference, &h, &s, &anchor) != HL_OK)
    return NULL;
  double add_h = h - anchor.h, add_s = s - anchor.s;
  HlHelmholtz *moved = g_memdup2 (eq, sizeof *eq);
  moved->ideal_a2 += add_h / (eq->R * eq->T_reducing);
  moved->ideal_a1 -= add_s / eq->R;
  for (guint i = 0; i < HL_SAT_NODES; i++)
    {
      moved->sat.y[HL_SAT_H_LIQUID][i] += add_h;
      moved->sat.y[HL_SAT_H_VAPOUR][i] += add_h;
      moved->sat.y[HL_SAT_S_LIQUID][i] += add_s;
      moved->sat.y[HL_SAT_S_VAPOUR][i] += add_s;
    }
  for (guint level = 0; level < eq->start.n_levels; level++)
    for (guint i = 0; i <= HL_START_STEPS; i++)
      {
        moved->start.h[level][i] += add_h;
        moved->start.s[level][i] += add_s;
      }
  moved->grid = g_new0 (HlStartGrid *, 1);
  moved->fluid.id = g_strdup (id);
  moved->zero = g_strdup (strchr (id, '@') + 1);
  moved->fluid.data = moved;
  return moved;
}
