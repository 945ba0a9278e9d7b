/* The terms of a Helmholtz equation of state and their derivatives to second order.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "fluid/helmholtz-private.h"

#include <math.h>

/* Every residual term but the non-analytic one is n exp(L) with L a sum of
 * logarithms and polynomials.  With D = delta L_delta and T = tau L_tau the
 * derivatives follow from D, T and their own slopes:
 *   delta^2 a_dd = (D^2 - D + delta D_delta) a,  delta tau a_dt = D T a,  and so for tau. */
static inline void
add_term (HlAlpha *sum, double a, double D, double D_d, double T, double T_t)
{
  sum->a += a;
  sum->d += a * D;
  sum->t += a * T;
  sum->dd += a * (D * (D - 1.0) + D_d);
  sum->dt += a * D * T;
  sum->tt += a * (T * (T - 1.0) + T_t);
}

/* Where the machine has vectors of four doubles the column below uses them, with the
 * same results to the last bit: no multiplication is fused with an addition. */
#if defined (__x86_64__) && defined (__GLIBC__) && defined (__GNUC__) && !defined (__clang__)
#define TWICE_AS_WIDE __attribute__ ((target_clones ("avx2", "default")))
#else
#define TWICE_AS_WIDE
#endif

/* e^x of a whole column at once, which the compiler turns into vector
 * instructions where exp() would be called number by number.  x = k ln 2 + r with
 * |r| <= ln(2)/2; Taylor's series to r^13, whose next term is below 5e-18; 2^k goes
 * into the exponent bits.  Below -708 the result is the smallest normal number, as
 * good as 0 here. */
TWICE_AS_WIDE static void
exp_column (double *x, guint n)
{
  const double per_ln2 = 1.4426950408889634, ln2_high = 0x1.62e42fee00000p-1, ln2_low = 0x1.a39ef35793c76p-33;
  const double shift = 0x1.8p52;      /* adding it rounds to a whole number, which then stands in the low bits */
  for (guint i = 0; i < n; i++)
    {
      double in = x[i] > -708.0 ? x[i] : -708.0;
      double shifted = in * per_ln2 + shift, k = shifted - shift;
      double r = (in - k * ln2_high) - k * ln2_low;
      double sum = 1.0 / 6227020800.0;
      sum = sum * r + 1.0 / 479001600.0;
      sum = sum * r + 1.0 / 39916800.0;
      sum = sum * r + 1.0 / 3628800.0;
      sum = sum * r + 1.0 / 362880.0;
      sum = sum * r + 1.0 / 40320.0;
      sum = sum * r + 1.0 / 5040.0;
      sum = sum * r + 1.0 / 720.0;
      sum = sum * r + 1.0 / 120.0;
      sum = sum * r + 1.0 / 24.0;
      sum = sum * r + 1.0 / 6.0;
      sum = sum * r + 0.5;
      sum = 1.0 + (r + r * r * sum);
      union { double number; guint64 bits; } whole = { shifted }, result = { sum };
      result.bits += whole.bits << 52;
      x[i] = result.number;
    }
}

static void
add_power_terms (const HlHelmholtz *eq, double delta, double ln_delta, double ln_tau, HlAlpha *sum)
{
  const HlPowerTerms *terms = &eq->power;
  double delta_l[HL_HELMHOLTZ_MAX_POWER + 1];
  double value[HL_HELMHOLTZ_MAX_TERMS];
  guint n = terms->n_terms;
  delta_l[0] = 0.0;      /* no exponential */
  double power = 1.0;
  for (guint l = 1; l <= eq->power_l_max; l++)
    delta_l[l] = power *= delta;
  for (guint i = 0; i < n; i++)
    value[i] = terms->t[i] * ln_tau + terms->d[i] * ln_delta - delta_l[terms->l[i]];
  exp_column (value, n);
  for (guint i = 0; i < n; i++)
    {
      double l = terms->l[i], l_delta_l = l * delta_l[terms->l[i]];
      add_term (sum, terms->n[i] * value[i], terms->d[i] - l_delta_l, -l * l_delta_l, terms->t[i], 0.0);
    }
}

static void
add_exponential_terms (const HlHelmholtz *eq, double ln_delta, double ln_tau, HlAlpha *sum)
{
  for (guint i = 0; i < eq->n_exponential; i++)
    {
      const HlExponentialTerm *e = &eq->exponential[i];
      double g = e->g != 0.0 ? e->g * exp (e->l * ln_delta) : 0.0;
      double k = e->k != 0.0 ? e->k * exp (e->m * ln_tau) : 0.0;
      double a = e->n * exp (e->d * ln_delta + e->t * ln_tau - g - k);
      add_term (sum, a, e->d - e->l * g, -e->l * e->l * g, e->t - e->m * k, -e->m * e->m * k);
    }
}

static void
add_gaussian_terms (const HlHelmholtz *eq, double delta, double tau, double ln_delta, double ln_tau, HlAlpha *sum)
{
  double value[HL_HELMHOLTZ_MAX_TERMS];
  for (guint i = 0; i < eq->n_gaussian; i++)
    {
      const HlGaussianTerm *g = &eq->gaussian[i];
      double from_d = delta - g->epsilon, from_t = tau - g->gamma;
      value[i] = g->d * ln_delta + g->t * ln_tau - g->eta * from_d * from_d - g->beta * from_t * from_t;
    }
  exp_column (value, eq->n_gaussian);
  for (guint i = 0; i < eq->n_gaussian; i++)
    {
      const HlGaussianTerm *g = &eq->gaussian[i];
      double from_d = delta - g->epsilon, from_t = tau - g->gamma, a = g->n * value[i];
      double eta = 2.0 * g->eta * delta, beta = 2.0 * g->beta * tau;
      add_term (sum, a, g->d - eta * from_d, -eta * (delta + from_d), g->t - beta * from_t, -beta * (tau + from_t));
    }
}

static void
add_gao_terms (const HlHelmholtz *eq, double delta, double tau, double ln_delta, double ln_tau, HlAlpha *sum)
{
  for (guint i = 0; i < eq->n_gao; i++)
    {
      const HlGaoTerm *g = &eq->gao[i];
      double from_d = delta - g->epsilon, from_t = tau - g->gamma;
      double q = 1.0 / (g->beta * from_t * from_t + g->b);
      double a = g->n * exp (g->d * ln_delta + g->t * ln_tau + g->eta * from_d * from_d + q);
      double eta = 2.0 * g->eta * delta, beta = 2.0 * g->beta * tau * q * q;
      add_term (sum, a, g->d + eta * from_d, eta * (delta + from_d),
                g->t - beta * from_t, -beta * (tau + from_t) + 2.0 * beta * beta * from_t * from_t / q);
    }
}

/* The distance Delta from the critical point and what it is made of; terms with the
 * same exponents share it. */
typedef struct {
  const HlNonAnalyticTerm *of;
  double inner, outer, theta, Delta, ln_Delta;
} Distance;

static void
distance_of (const HlNonAnalyticTerm *c, double y, double xx, double ln_xx, Distance *distance)
{
  double inner = exp ((0.5 / c->beta - 1.0) * ln_xx), outer = exp ((c->a - 1.0) * ln_xx), theta = y + c->A * inner * xx;
  double Delta = theta * theta + c->B * outer * xx;
  *distance = (Distance) { .of = c, .inner = inner, .outer = outer, .theta = theta, .Delta = Delta, .ln_Delta = log (Delta) };
}

/* IAPWS R6-95(2018), Table 5, with the factors (delta-1)^-1 taken out so that the
 * line delta = 1 needs no limit; at the critical point itself Delta = 0 and its
 * powers have no bound, so the distance is kept above 1e-12 there (xx is its
 * square).  Far from that point the exponential leaves nothing: e^-80 times the
 * largest factor of a second derivative, (2 D)^2, is below 1e-28. */
static void
add_non_analytic_term (const HlNonAnalyticTerm *c, double delta, double tau, double xx, double ln_xx, Distance *distance, HlAlpha *sum)
{
  double x = delta - 1.0, y = 1.0 - tau;
  if (c->C * x * x + c->D * y * y > 80.0)
    return;
  if (distance->of == NULL || distance->of->beta != c->beta || distance->of->a != c->a || distance->of->A != c->A || distance->of->B != c->B)
    distance_of (c, y, xx, ln_xx, distance);
  double inner = distance->inner, outer = distance->outer, theta = distance->theta, Delta = distance->Delta;
  /* Delta_d = x slope, Delta_dd = slope + curve */
  double slope = c->A * theta * 2.0 / c->beta * inner + 2.0 * c->B * c->a * outer;
  double curve = 4.0 * c->B * c->a * (c->a - 1.0) * outer + 2.0 * c->A * c->A / (c->beta * c->beta) * inner * inner * xx
                 + c->A * theta * 4.0 / c->beta * (0.5 / c->beta - 1.0) * inner;
  double Delta_d = x * slope, Delta_dd = slope + curve;
  double P = exp (c->b * distance->ln_Delta), P1 = c->b * P / Delta, P2 = (c->b - 1.0) * P1 / Delta;
  double P_d = P1 * Delta_d, P_dd = P1 * Delta_dd + P2 * Delta_d * Delta_d;
  double P_t = -2.0 * theta * P1, P_tt = 2.0 * P1 + 4.0 * theta * theta * P2;
  double P_dt = -c->A * 2.0 / c->beta * P1 * x * inner - 2.0 * theta * P2 * Delta_d;
  double Psi = c->n * exp (-c->C * x * x - c->D * y * y);
  double Psi_d = -2.0 * c->C * x * Psi, Psi_dd = (2.0 * c->C * x * x - 1.0) * 2.0 * c->C * Psi;
  double Psi_t = 2.0 * c->D * y * Psi, Psi_tt = (2.0 * c->D * y * y - 1.0) * 2.0 * c->D * Psi;
  double Psi_dt = -4.0 * c->C * c->D * x * y * Psi;
  sum->a += P * delta * Psi;
  sum->d += delta * (P * (Psi + delta * Psi_d) + P_d * delta * Psi);
  sum->t += tau * delta * (P_t * Psi + P * Psi_t);
  sum->dd += delta * delta * (P * (2.0 * Psi_d + delta * Psi_dd) + 2.0 * P_d * (Psi + delta * Psi_d) + P_dd * delta * Psi);
  sum->tt += tau * tau * delta * (P_tt * Psi + 2.0 * P_t * Psi_t + P * Psi_tt);
  sum->dt += delta * tau * (P * (Psi_t + delta * Psi_dt) + delta * P_d * Psi_t + P_t * (Psi + delta * Psi_d) + P_dt * delta * Psi);
}

void
hl_helmholtz_residual (const HlHelmholtz *eq, double delta, double tau, HlAlpha *alpha)
{
  HlAlpha sum = { 0 };
  double ln_delta = log (delta), ln_tau = log (tau);
  add_power_terms (eq, delta, ln_delta, ln_tau, &sum);
  add_exponential_terms (eq, ln_delta, ln_tau, &sum);
  add_gaussian_terms (eq, delta, tau, ln_delta, ln_tau, &sum);
  add_gao_terms (eq, delta, tau, ln_delta, ln_tau, &sum);
  if (eq->n_non_analytic > 0)
    {
      double xx = fmax ((delta - 1.0) * (delta - 1.0), 1e-24), ln_xx = log (xx);
      Distance distance = { NULL };
      for (guint i = 0; i < eq->n_non_analytic; i++)
        add_non_analytic_term (&eq->non_analytic[i], delta, tau, xx, ln_xx, &distance, &sum);
    }
  *alpha = sum;
}

/* n ln(c + d e), e = exp(t tau).  Both forms of the files stay finite: 1 - e with
 * t below 0, and c + d e with e that may overflow only far below any range. */
static inline void
add_planck_term (const HlPlanckTerm *term, double tau, HlAlpha *sum)
{
  double e = exp (term->t * tau), inside = term->c + term->d * e;
  double slope = term->d * e / inside, arm = term->t * tau;
  sum->a += term->n * log (inside);
  sum->t += term->n * arm * slope;
  sum->tt += term->n * arm * arm * slope * (1.0 - slope);
}

void
hl_helmholtz_ideal (const HlHelmholtz *eq, double tau, HlAlpha *alpha)
{
  double ln_tau = log (tau);
  HlAlpha sum = {
    .a = eq->ideal_a1 + eq->ideal_a2 * tau + eq->ideal_log * ln_tau,
    .t = eq->ideal_a2 * tau + eq->ideal_log,
    .tt = -eq->ideal_log,
  };
  for (guint i = 0; i < eq->n_ideal_power; i++)
    {
      double t = eq->ideal_power[i].t, a = eq->ideal_power[i].n * exp (t * ln_tau);
      sum.a += a;
      sum.t += t * a;
      sum.tt += t * (t - 1.0) * a;
    }
  for (guint i = 0; i < eq->n_planck; i++)
    add_planck_term (&eq->planck[i], tau, &sum);
  *alpha = sum;
}
