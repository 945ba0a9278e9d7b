/* Gas below its dew point: saturated with water vapour, the rest of the water liquid beside it.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "fluid/gas-private.h"

#include <math.h>

#include "fluid/if97-private.h"

/* Water vapour has the saturation pressure of IF97 as its partial pressure; the
 * liquid is that of IF97 at the full pressure, its enthalpy and entropy moved to
 * the zeros of the gas at 298.15 K: enthalpy of formation of the liquid -285.830
 * kJ/mol (CODATA key values, J. D. Cox, D. D. Wagman, V. A. Medvedev 1989), and the
 * entropy for which liquid and vapour at 298.15 K are in equilibrium. */

typedef struct {
  double M;                           /* [kg/mol] */
  double add_h, add_s;                /* to IF97 [J/kg], [J/(kg K)] */
} LiquidZero;

static const LiquidZero *
liquid_zero (void)
{
  static gsize once;
  static LiquidZero zero;
  if (g_once_init_enter (&once))
    {
      const HlGasData *data = hl_gas_data ();
      const HlGasSpecies *water = &data->species[data->water];
      HlState liquid;
      double T = 298.15, p = hl_if97_psat (T);
      hl_if97_region1 (HL_GAS_P0, T, &liquid);
      double h_vapour = data->R * hl_gas_h (&water->molar, T);
      double s_vapour = data->R * (hl_gas_s (&water->molar, T, log (T)) - log (p / HL_GAS_P0));
      zero.M = water->M;
      zero.add_h = HL_GAS_H_LIQUID_WATER / water->M - liquid.h;
      zero.add_s = (s_vapour - (h_vapour - HL_GAS_H_LIQUID_WATER) / T) / water->M - liquid.s;
      g_once_init_leave (&once, 1);
    }
  return &zero;
}

/* One mole of liquid at (p,T) with its slopes. */
typedef struct { double h, s, v, h_T, s_T, v_T, h_p, s_p, v_p; } Liquid;

static void
liquid_at (double p, double T, Liquid *liquid)
{
  const LiquidZero *zero = liquid_zero ();
  HlState st;
  hl_if97_region1 (p, T, &st);
  double v_T = st.v_h * st.cp, h_p = st.v - T * v_T;
  *liquid = (Liquid) {
    .h = zero->M * (st.h + zero->add_h), .s = zero->M * (st.s + zero->add_s), .v = zero->M * st.v,
    .h_T = zero->M * st.cp, .s_T = zero->M * st.cp / T, .v_T = zero->M * v_T,
    .h_p = zero->M * h_p, .s_p = -zero->M * v_T, .v_p = zero->M * (st.v_p + st.v_h * h_p),
  };
}

/* One mole of vapour at its saturation pressure; slopes along the line. */
typedef struct { double p, p_T, h, s, h_T, s_T; } Vapour;

static void
vapour_at (double T, double ln_T, Vapour *vapour)
{
  const HlGasData *data = hl_gas_data ();
  const HlGasPolynomial *molar = &data->species[data->water].molar;
  double cp = data->R * hl_gas_cp (molar, T);
  vapour->p = hl_if97_psat_T (T, &vapour->p_T);
  vapour->h = data->R * hl_gas_h (molar, T);
  vapour->s = data->R * (hl_gas_s (molar, T, ln_T) - log (vapour->p / HL_GAS_P0));
  vapour->h_T = cp;
  vapour->s_T = cp / T - data->R * vapour->p_T / vapour->p;
}

/* Everything of the equilibrium, per kg. */
typedef struct {
  double n_vapour, n_liquid;          /* [mol/kg] */
  double h, s, v, h_T, s_T, v_T, h_p, s_p, v_p;
} Equilibrium;

static void
equilibrium (const HlGas *gas, double p, double T, Equilibrium *eq)
{
  double R = hl_gas_data ()->R, ln_T = log (T), cp_dry = hl_gas_cp (&gas->dry, T);
  Liquid liquid;
  Vapour vapour;
  liquid_at (p, T, &liquid);
  vapour_at (T, ln_T, &vapour);
  double p_dry = p - vapour.p, n_dry = gas->n_dry;
  double n_vapour = n_dry * vapour.p / p_dry, n_liquid = gas->n_water - n_vapour;
  double n_T = n_dry * p * vapour.p_T / (p_dry * p_dry), n_p = -n_vapour / p_dry;
  double v_gas = n_dry * R * T / p_dry;
  *eq = (Equilibrium) {
    .n_vapour = n_vapour, .n_liquid = n_liquid,
    .h = hl_gas_h (&gas->dry, T) + n_vapour * vapour.h + n_liquid * liquid.h,
    .s = hl_gas_s (&gas->dry, T, ln_T) - n_dry * R * log (p_dry / HL_GAS_P0) + n_vapour * vapour.s + n_liquid * liquid.s,
    .v = v_gas + n_liquid * liquid.v,
    .h_T = cp_dry + n_vapour * vapour.h_T + n_liquid * liquid.h_T + n_T * (vapour.h - liquid.h),
    .s_T = cp_dry / T + n_dry * R * vapour.p_T / p_dry + n_vapour * vapour.s_T + n_liquid * liquid.s_T + n_T * (vapour.s - liquid.s),
    .v_T = v_gas / T + v_gas * vapour.p_T / p_dry + n_liquid * liquid.v_T - n_T * liquid.v,
    .h_p = n_p * (vapour.h - liquid.h) + n_liquid * liquid.h_p,
    .s_p = -n_dry * R / p_dry + n_p * (vapour.s - liquid.s) + n_liquid * liquid.s_p,
    .v_p = -v_gas / p_dry - n_p * liquid.v + n_liquid * liquid.v_p,
  };
}

void
hl_gas_wet_values (const HlGas *gas, double p, double T, HlGasWet *wet)
{
  Equilibrium eq;
  equilibrium (gas, p, T, &eq);
  *wet = (HlGasWet) { .h = eq.h, .s = eq.s, .h_T = eq.h_T, .s_T = eq.s_T };
}

void
hl_gas_wet_state (const HlGas *gas, double p, double T, HlState *state)
{
  Equilibrium eq;
  equilibrium (gas, p, T, &eq);
  double T_p = -eq.h_p / eq.h_T;
  *state = (HlState) {
    .p = p, .T = T, .h = eq.h, .s = eq.s, .v = eq.v, .u = eq.h - p * eq.v,
    .cp = NAN, .cv = NAN, .w = NAN, .x = 1.0 - eq.n_liquid * liquid_zero ()->M,
    .T_p = T_p, .T_h = 1.0 / eq.h_T,
    .s_p = eq.s_p + eq.s_T * T_p, .s_h = eq.s_T / eq.h_T,
    .v_p = eq.v_p + eq.v_T * T_p, .v_h = eq.v_T / eq.h_T,
    .phase = HL_PHASE_TWO_PHASE,
  };
}

gboolean
hl_gas_is_wet (const HlGas *gas, double p, double T)
{
  return gas->y_water > 0.0 && T >= HL_GAS_T_ICE && T < HL_IF97_T_13 && hl_if97_psat (T) < gas->y_water * p;
}

double
hl_gas_dew_T (const HlGas *gas, double p)
{
  return hl_if97_Tsat (gas->y_water * p);
}

/* Pressure of sublimation, IAPWS R14-08(2011), Eq. 6 (coefficients from memory,
 * proved by the check value of its Table 3). */
double
hl_gas_ice_pressure (double T)
{
  double theta = T / 273.16;
  return 611.657 * exp ((-0.212144006e2 * pow (theta, 0.333333333e-2) + 0.273203819e2 * pow (theta, 0.120666667e1)
                         - 0.610598130e1 * pow (theta, 0.170333333e1)) / theta);
}

gboolean
hl_gas_is_icy (const HlGas *gas, double p, double T)
{
  return gas->y_water > 0.0 && T < HL_GAS_T_ICE && hl_gas_ice_pressure (T) < gas->y_water * p;
}

/**
 * hl_gas_water_dew_point:
 * @gas: a gas
 * @p: pressure [Pa]
 *
 * Where the partial pressure of its water is the saturation pressure of IF97.
 *
 * Returns: [K]; NaN without water, below 273.15 K where ice would form, and off the pressures of a gas
 */
double
hl_gas_water_dew_point (const HlFluid *gas, double p)
{
  g_return_val_if_fail (hl_gas_is_mixture (gas), NAN);
  const HlGas *mixture = hl_gas_of (gas);
  if (!(p > 0.0 && p <= HL_GAS_P_MAX && mixture->y_water * p >= hl_if97_psat (HL_GAS_T_ICE)))
    return NAN;
  return hl_gas_dew_T (mixture, p);
}
