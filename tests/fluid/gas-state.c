/* States of gases: laws on random states, closed answers, published values of air.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "gas-check.h"

static const char *const ids[] = {
  "air", "flue-gas", "gas:Ar=1", "gas:N2=0.7,CO2=0.1,H2O=0.15,O2=0.05", "gas:H2=0.6,CO=0.3,CH4=0.1", "gas:N2=0.4,H2O=0.6",
  "gas:N2=0.78,O2=0.2,H2O=0.02", "gas:N2=0.8,SO2=0.001,HCl=0.002,H2O=0.197", "gas:H2O=0.95,N2=0.05",
};

/* A random state: half of them below the dew point where there is water. */
static gboolean
random_state (GRand *random, const HlFluid *gas, HlState *state)
{
  HlFluidLimits limits;
  hl_fluid_limits (gas, &limits);
  double p = exp (g_rand_double_range (random, log (1e3), log (10e6)));
  double T = exp (g_rand_double_range (random, log (limits.T_min), log (limits.T_max))), dew = hl_gas_water_dew_point (gas, p);
  if (!isnan (dew) && g_rand_boolean (random))
    T = fmax (limits.T_min, g_rand_double_range (random, 273.15, dew));
  return hl_fluid_state_pT (gas, p, T, state) == HL_OK;
}

static void
assert_same (const char *pair, const HlState *a, const HlState *b, double floor_h)
{
  double close = 1e-9;
  if (!(fabs (a->p / b->p - 1.0) < close && fabs (a->T / b->T - 1.0) < close && fabs (a->h - b->h) < close * fmax (fabs (b->h), floor_h)
        && fabs (a->s - b->s) < close * fmax (fabs (b->s), 1e3) && fabs (a->v / b->v - 1.0) < close && a->phase == b->phase))
    g_error ("(%s): p %.12g %.12g, T %.12g %.12g, h %.12g %.12g, s %.12g %.12g", pair, a->p, b->p, a->T, b->T, a->h, b->h, a->s, b->s);
}

/* Law: every pair leads back to the state, to 1e-9. */
static void
test_pairs_come_back (void)
{
  g_autoptr (GRand) random = g_rand_new_with_seed (41);
  guint n_wet = 0, n_dry = 0;
  for (gsize i = 0; i < G_N_ELEMENTS (ids); i++)
    for (int k = 0; k < 2000; k++)
      {
        HlState a, b;
        const HlFluid *gas = gas_of (ids[i]);
        if (!random_state (random, gas, &a))
          continue;
        *(a.phase == HL_PHASE_GAS ? &n_dry : &n_wet) += 1;
        g_assert_cmpint (hl_fluid_state_ph (gas, a.p, a.h, &b), ==, HL_OK);
        assert_same ("p,h", &b, &a, 1e5);
        g_assert_cmpint (hl_fluid_state_ps (gas, a.p, a.s, &b), ==, HL_OK);
        assert_same ("p,s", &b, &a, 1e5);
        g_assert_cmpint (hl_fluid_state_dT (gas, 1.0 / a.v, a.T, &b), ==, HL_OK);
        assert_same ("d,T", &b, &a, 1e5);
        if (hl_fluid_state_hs (gas, a.h, a.s, &b) != HL_OK)
          g_error ("%s: no state at h = %.12g, s = %.12g, which is p = %.12g, T = %.12g", ids[i], a.h, a.s, a.p, a.T);
        assert_same ("h,s", &b, &a, 1e5);
      }
  g_assert_cmpuint (n_wet, >, 3000);
  g_assert_cmpuint (n_dry, >, 5000);
}

/* Law: the derivatives are those of the functions, by central differences. */
static void
test_derivatives_belong_to_the_functions (void)
{
  g_autoptr (GRand) random = g_rand_new_with_seed (42);
  guint n = 0;
  for (gsize i = 0; i < G_N_ELEMENTS (ids); i++)
    for (int k = 0; k < 600; k++)
      {
        const HlFluid *gas = gas_of (ids[i]);
        HlState at, low, high;
        if (!random_state (random, gas, &at))
          continue;
        for (int by_h = 0; by_h <= 1; by_h++)
          {
            double step = by_h ? 1e-6 * at.T / at.T_h : 1e-6 * at.p;
            if (hl_fluid_state_ph (gas, at.p - !by_h * step, at.h - by_h * step, &low) != HL_OK
                || hl_fluid_state_ph (gas, at.p + !by_h * step, at.h + by_h * step, &high) != HL_OK || low.phase != high.phase
                || ((low.T > 1000.0) != (high.T > 1000.0)))
              continue;
            const struct { double ours, low, high, scale; } rows[] = {
              { by_h ? at.T_h : at.T_p, low.T, high.T, at.T }, { by_h ? at.s_h : at.s_p, low.s, high.s, 1e3 }, { by_h ? at.v_h : at.v_p, low.v, high.v, at.v },
            };
            for (gsize r = 0; r < G_N_ELEMENTS (rows); r++)
              {
                double measured = (rows[r].high - rows[r].low) / (2.0 * step), scale = rows[r].scale / (step / 1e-6);
                if (!(fabs (rows[r].ours - measured) <= 1e-6 * fmax (fabs (measured), scale)))
                  g_error ("%s at p = %g, T = %g, phase %d, by %s: derivative %d is %.10g, differences say %.10g", ids[i], at.p, at.T, at.phase,
                           by_h ? "h" : "p", (int) r, rows[r].ours, measured);
                n++;
              }
          }
      }
  g_assert_cmpuint (n, >, 15000);
}

static double
of_gas (const char *kind, const char *subject, const char *at)
{
  const HlFluid *gas = gas_of (subject);
  double T = g_ascii_strtod (at, NULL);
  HlFluidLimits limits;
  HlState state, base;
  hl_fluid_limits (gas, &limits);
  g_assert_cmpint (hl_fluid_state_pT (gas, 101325.0, T, &state), ==, HL_OK);
  g_assert_cmpint (hl_fluid_state_pT (gas, 101325.0, 300.0, &base), ==, HL_OK);
  return strcmp (kind, "M") == 0 ? 1e3 * limits.molar_mass : strcmp (kind, "cp_mass") == 0 ? state.cp / 1e3
         : strcmp (kind, "dh_300") == 0 ? (state.h - base.h) / 1e3 : state.w;
}

static void
test_air_agrees_with_published_values (void)
{
  static const char *const kinds[] = { "M", "cp_mass", "dh_300", "w" };
  for (gsize i = 0; i < G_N_ELEMENTS (kinds); i++)
    check_published (kinds[i], of_gas);
}

/* A perfect gas has closed answers: argon, cp = 5/2 R, isentropic p v^(5/3) constant, w^2 = 5/3 R T. */
static void
test_argon_is_a_perfect_gas (void)
{
  const HlFluid *argon = gas_of ("gas:Ar=1");
  double R = 8.31451 / 39.948e-3;
  HlState a, b;
  g_assert_cmpint (hl_fluid_state_pT (argon, 1e5, 300.0, &a), ==, HL_OK);
  g_assert_cmpfloat_with_epsilon (a.cp, 2.5 * R, 1e-9);
  g_assert_cmpfloat_with_epsilon (a.cv, 1.5 * R, 1e-9);
  g_assert_cmpfloat_with_epsilon (a.v, R * 300.0 / 1e5, 1e-12);
  g_assert_cmpfloat_with_epsilon (a.w, sqrt (5.0 / 3.0 * R * 300.0), 1e-9);
  g_assert_cmpint (a.phase, ==, HL_PHASE_GAS);
  g_assert_true (isnan (a.x));
  g_assert_cmpint (hl_fluid_state_ps (argon, 8e5, a.s, &b), ==, HL_OK);
  g_assert_cmpfloat_with_epsilon (b.T, 300.0 * pow (8.0, 0.4), 1e-9);
  g_assert_cmpint (hl_fluid_state_hs (argon, b.h, b.s, &a), ==, HL_OK);
  g_assert_cmpfloat_with_epsilon (a.p, 8e5, 1e-3);
}

/* Law: mixing at constant pressure and temperature keeps the enthalpy and makes -R sum y ln y of entropy. */
static void
test_mixing_makes_entropy (void)
{
  HlState n2, o2, mixed;
  HlFluidLimits of_n2, of_o2, of_mixed;
  const HlFluid *fluids[] = { gas_of ("gas:N2=1"), gas_of ("gas:O2=1"), gas_of ("gas:N2=0.75,O2=0.25") };
  g_assert_cmpint (hl_fluid_state_pT (fluids[0], 2e5, 450.0, &n2), ==, HL_OK);
  g_assert_cmpint (hl_fluid_state_pT (fluids[1], 2e5, 450.0, &o2), ==, HL_OK);
  g_assert_cmpint (hl_fluid_state_pT (fluids[2], 2e5, 450.0, &mixed), ==, HL_OK);
  hl_fluid_limits (fluids[0], &of_n2);
  hl_fluid_limits (fluids[1], &of_o2);
  hl_fluid_limits (fluids[2], &of_mixed);
  g_assert_cmpfloat_with_epsilon (mixed.h * of_mixed.molar_mass, 0.75 * n2.h * of_n2.molar_mass + 0.25 * o2.h * of_o2.molar_mass, 1e-9);
  g_assert_cmpfloat_with_epsilon (mixed.s * of_mixed.molar_mass,
                                  0.75 * n2.s * of_n2.molar_mass + 0.25 * o2.s * of_o2.molar_mass - 8.31451 * (0.75 * log (0.75) + 0.25 * log (0.25)), 1e-9);
}

/* The zero: elements at 298.15 K have h = 0, a burnt gas carries its heat of formation; the
 * sensible heat counts from the gas at 298.15 K. */
static void
test_zero_of_enthalpy (void)
{
  HlState state;
  g_assert_cmpint (hl_fluid_state_pT (gas_of ("gas:N2=0.79,O2=0.21"), 1e5, 298.15, &state), ==, HL_OK);
  g_assert_cmpfloat_with_epsilon (state.h, 0.0, 1.0);
  g_assert_cmpint (hl_fluid_state_pT (gas_of ("gas:CO2=1"), 1e5, 298.15, &state), ==, HL_OK);
  g_assert_cmpfloat_with_epsilon (state.h * 44.0098e-3, -393.51e3, 10.0);
  g_assert_cmpfloat (hl_gas_zero_enthalpy (gas_of ("gas:CO2=1")), ==, state.h);
}

int
main (int argc, char *argv[])
{
  g_test_init (&argc, &argv, NULL);
  g_test_add_func ("/fluid/gas-state/pairs", test_pairs_come_back);
  g_test_add_func ("/fluid/gas-state/derivatives", test_derivatives_belong_to_the_functions);
  g_test_add_func ("/fluid/gas-state/air", test_air_agrees_with_published_values);
  g_test_add_func ("/fluid/gas-state/argon", test_argon_is_a_perfect_gas);
  g_test_add_func ("/fluid/gas-state/mixing", test_mixing_makes_entropy);
  g_test_add_func ("/fluid/gas-state/zero", test_zero_of_enthalpy);
  return g_test_run ();
}
