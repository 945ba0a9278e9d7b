/* The forms of equations that components are made of, each with exact derivatives.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#pragma once
#include "engine/system.h"
G_BEGIN_DECLS

#define HL_ALL_LINEAR 0xffffffffu

/* Each adds one equation and returns it for further marks; variables are named by what they stand for.
 * p_* are pressures (carried as logarithms). */
HlEquation *hl_add_linear   (HlSystem *system, HlVarKind kind, const int *vars, const double *factors, int n, double constant);
HlEquation *hl_add_equal    (HlSystem *system, int a, int b);
/* Sum of sign[k] a_k b_k over n_pairs, plus sum of factor[k] c_k, is zero. */
HlEquation *hl_add_energy   (HlSystem *system, HlVarKind kind, const int *pairs, const double *signs, int n_pairs,
                             const int *rest, const double *factors, int n_rest);
HlEquation *hl_add_product  (HlSystem *system, int a, int b, int product);                 /* product = a b */
HlEquation *hl_add_quotient (HlSystem *system, int quotient, int top, int bottom);         /* computes quotient */
HlEquation *hl_add_pressure_loss (HlSystem *system, int p_in, int p_out, int loss);
HlEquation *hl_add_pressure_rise (HlSystem *system, int p_in, int p_out, int rise);
HlEquation *hl_add_expansion   (HlSystem *system, const HlFluid *fluid, int p_in, int h_in, int p_out, int efficiency, int h_out);
HlEquation *hl_add_compression (HlSystem *system, const HlFluid *fluid, int p_in, int h_in, int p_out, int efficiency, int h_out);
HlEquation *hl_add_overall_efficiency (HlSystem *system, const HlFluid *fluid, int p_in, int h_in, int p_out, int efficiency, int h_out);
HlEquation *hl_add_straight_line (HlSystem *system, const HlFluid *fluid, int p_in, int h_in, int p_end, int h_end, int p, int h);

/* State conditions.  "enthalpy at" is the form for a value that drives the state; the other one computes it. */
HlEquation *hl_add_enthalpy_at_temperature (HlSystem *system, const HlFluid *fluid, int p, int T, int h);
/* The same where the pressure may be what the temperature sets. */
HlEquation *hl_add_enthalpy_condition      (HlSystem *system, const HlFluid *fluid, int p, int T, int h);
HlEquation *hl_add_temperature             (HlSystem *system, const HlFluid *fluid, int p, int h, int T);
HlEquation *hl_add_enthalpy_at_entropy     (HlSystem *system, const HlFluid *fluid, int p, int s, int h);
HlEquation *hl_add_entropy                 (HlSystem *system, const HlFluid *fluid, int p, int h, int s);
HlEquation *hl_add_enthalpy_at_quality     (HlSystem *system, const HlFluid *fluid, int p, int x, int h);
HlEquation *hl_add_quality                 (HlSystem *system, const HlFluid *fluid, int p, int h, int x);
HlEquation *hl_add_enthalpy_at_moisture    (HlSystem *system, const HlFluid *fluid, int p, int y, int h);
HlEquation *hl_add_moisture                (HlSystem *system, const HlFluid *fluid, int p, int h, int y);
HlEquation *hl_add_volume                  (HlSystem *system, const HlFluid *fluid, int p, int h, int v);
HlEquation *hl_add_saturation              (HlSystem *system, const HlFluid *fluid, int p, int T);
HlEquation *hl_add_liquid                  (HlSystem *system, const HlFluid *fluid, int p, int subcooling, int h);
HlEquation *hl_add_vapour                  (HlSystem *system, const HlFluid *fluid, int p, int superheat, int h);
HlEquation *hl_add_subcooled_temperature   (HlSystem *system, const HlFluid *fluid, int p, int subcooling, int T);

/* heat = flow (h(p, T_in + rise) - h(p, T_in)) */
HlEquation *hl_add_cooling_heat (HlSystem *system, const HlFluid *fluid, int heat, int flow, int T_in, int rise, int p);
/* Logarithmic mean of (rise + least) and least. */
HlEquation *hl_add_log_mean     (HlSystem *system, int mean, int rise, int least);
/* dst = what the tie says of @of, in SI.  @of: variables of hl_tie_of(). */
HlEquation *hl_add_tie          (HlSystem *system, int dst, const HlTie *tie, const int *of);

/* Logarithmic mean of two temperature differences, with a monotone extension below zero, and its derivatives. */
double hl_log_mean (double d1, double d2, double *to_d1, double *to_d2);

/* Property calls that one evaluation makes. */
int      hl_equation_property_calls (const HlEquation *equation);
gboolean hl_equation_is_energy (const HlEquation *equation);
gboolean hl_equation_is_linear (const HlEquation *equation);
gboolean hl_equation_is_tie    (const HlEquation *equation);
gboolean hl_equation_wants_saturation (const HlEquation *equation);   /* has no meaning above the critical pressure */
const char *hl_equation_source (const HlEquation *equation);          /* marked for translation: where it comes from */

static inline gboolean
hl_equation_linear_in (const HlEquation *equation, int k)
{
  return equation->linear == HL_ALL_LINEAR || (k < 32 && (equation->linear >> k & 1u) != 0);
}
G_END_DECLS
