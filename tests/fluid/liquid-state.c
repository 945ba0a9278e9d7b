/* Liquids by polynomials: laws on random states, published values.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "fluid/liquid.h"

#include "fluid/fluid-facts.h"
#include "fluid/transport.h"
#include "gas-check.h"

static const char *const ids[] = { "mineral-oil", "engine-oil", "diphenyl-mixture", "ethylene-glycol-30", "propylene-glycol-40", "calcium-chloride-20" };

static void
random_state (GRand *random, const HlFluid *liquid, HlState *state)
{
  HlFluidLimits limits;
  hl_fluid_limits (liquid, &limits);
  g_assert_cmpint (hl_fluid_state_pT (liquid, g_rand_double_range (random, 1e4, limits.p_max), g_rand_double_range (random, limits.T_min, limits.T_max), state), ==, HL_OK);
}

/* Law: every pair leads back to the state. */
static void
test_pairs_come_back (void)
{
  g_autoptr (GRand) random = g_rand_new_with_seed (51);
  for (gsize i = 0; i < G_N_ELEMENTS (ids); i++)
    for (int k = 0; k < 1000; k++)
      {
        const HlFluid *liquid = gas_of (ids[i]);
        HlState a, b;
        random_state (random, liquid, &a);
        g_assert_cmpint (hl_fluid_state_ph (liquid, a.p, a.h, &b), ==, HL_OK);
        g_assert_cmpfloat_with_epsilon (b.T, a.T, 1e-9 * a.T);
        g_assert_cmpint (hl_fluid_state_ps (liquid, a.p, a.s, &b), ==, HL_OK);
        g_assert_cmpfloat_with_epsilon (b.T, a.T, 1e-9 * a.T);
        if (hl_fluid_state_hs (liquid, a.h, a.s, &b) != HL_OK)
          g_error ("%s: no state at h = %.12g, s = %.12g, which is p = %.12g, T = %.12g", ids[i], a.h, a.s, a.p, a.T);
        g_assert_cmpfloat_with_epsilon (b.T, a.T, 1e-9 * a.T);
        /* Pressure hardly shows in h and s of a liquid: dp = T ds/v, so rounding of s costs some 0.1 Pa. */
        g_assert_cmpfloat_with_epsilon (b.p, a.p, 1.0);
      }
}

/* Laws: (dh/dp)_T = v - T (dv/dT)_p, ds = (dh - v dp)/T, and the derivatives are those of the functions. */
static void
test_nothing_contradicts (void)
{
  g_autoptr (GRand) random = g_rand_new_with_seed (52);
  for (gsize i = 0; i < G_N_ELEMENTS (ids); i++)
    for (int k = 0; k < 200; k++)
      {
        const HlFluid *liquid = gas_of (ids[i]);
        HlFluidLimits limits;
        HlState a, hot, high;
        hl_fluid_limits (liquid, &limits);
        random_state (random, liquid, &a);
        double dT = 1e-2, dp = 1e4;
        if (a.T + dT > limits.T_max || a.p + dp > limits.p_max)
          continue;
        g_assert_cmpint (hl_fluid_state_pT (liquid, a.p, a.T + dT, &hot), ==, HL_OK);
        g_assert_cmpint (hl_fluid_state_pT (liquid, a.p + dp, a.T, &high), ==, HL_OK);
        g_assert_cmpfloat_with_epsilon ((hot.h - a.h) / dT / a.cp, 1.0, 1e-4);
        g_assert_cmpfloat_with_epsilon ((hot.s - a.s) / dT / (a.cp / a.T), 1.0, 1e-4);
        g_assert_cmpfloat_with_epsilon ((hot.v - a.v) / dT, a.v_h * a.cp, 1e-3 * fabs (a.v_h * a.cp));
        double v_T = a.v_h * a.cp;
        g_assert_cmpfloat_with_epsilon ((high.h - a.h) / dp, a.v - a.T * v_T, 1e-6 * a.v);
        g_assert_cmpfloat_with_epsilon ((high.s - a.s) / dp, -v_T, 1e-5 * a.v);
        g_assert_cmpfloat_with_epsilon (-a.T_p / a.T_h, a.v - a.T * v_T, 1e-12 * a.v);
        g_assert_cmpfloat_with_epsilon (a.u, a.h - a.p * a.v, 1e-9 * fabs (a.h));
        g_assert_cmpint (a.phase, ==, HL_PHASE_LIQUID);
      }
}

/* Zero: 273.15 K and one atmosphere; a pump does v dp of work at constant entropy. */
static void
test_pumping_takes_volume_times_pressure (void)
{
  HlState zero, in, out;
  const HlFluid *oil = gas_of ("mineral-oil");
  g_assert_cmpint (hl_fluid_state_pT (oil, 101325.0, 273.15, &zero), ==, HL_OK);
  g_assert_cmpfloat_with_epsilon (zero.h, 0.0, 1e-9);
  g_assert_cmpfloat_with_epsilon (zero.s, 0.0, 1e-12);
  g_assert_cmpint (hl_fluid_state_pT (oil, 1e5, 523.15, &in), ==, HL_OK);
  g_assert_cmpint (hl_fluid_state_ps (oil, 11e5, in.s, &out), ==, HL_OK);
  g_assert_cmpfloat_with_epsilon ((out.h - in.h) / (in.v * 10e5), 1.0, 1e-3);
}

static double
of_liquid (const char *kind, const char *subject, const char *at)
{
  HlState state;
  double value = NAN;
  g_assert_cmpint (hl_fluid_state_pT (gas_of (subject), 101325.0, g_ascii_strtod (at, NULL), &state), ==, HL_OK);
  if (strcmp (kind, "rho") == 0)
    return 1.0 / state.v;
  if (strcmp (kind, "cp_liquid") == 0)
    return state.cp;
  if (strcmp (kind, "lambda") == 0)
    {
      g_assert_cmpint (hl_fluid_conductivity (gas_of (subject), &state, &value), ==, HL_OK);
      return value;
    }
  g_assert_cmpint (hl_fluid_viscosity (gas_of (subject), &state, &value), ==, HL_OK);
  return 1e3 * value;
}

static void
test_liquids_agree_with_published_values (void)
{
  static const char *const kinds[] = { "rho", "cp_liquid", "lambda", "mu" };
  for (gsize i = 0; i < G_N_ELEMENTS (kinds); i++)
    check_published (kinds[i], of_liquid);
}

/* Trade knowledge: a liquid grows thinner and lighter when warm. */
static void
test_warm_liquids_are_thin_and_light (void)
{
  for (gsize i = 0; i < G_N_ELEMENTS (ids); i++)
    {
      const HlFluid *liquid = gas_of (ids[i]);
      HlFluidLimits limits;
      double thick = INFINITY, dense = INFINITY;
      hl_fluid_limits (liquid, &limits);
      for (double T = limits.T_min; T <= limits.T_max; T += 2.0)
        {
          HlState state;
          double viscosity;
          g_assert_cmpint (hl_fluid_state_pT (liquid, 1e5, T, &state), ==, HL_OK);
          g_assert_cmpint (hl_fluid_viscosity (liquid, &state, &viscosity), ==, HL_OK);
          g_assert_cmpfloat (viscosity, <, thick);
          g_assert_cmpfloat (1.0 / state.v, <, dense);
          thick = viscosity;
          dense = 1.0 / state.v;
        }
    }
}

static void
test_it_is_a_liquid (void)
{
  HlFluidFacts facts;
  g_assert_true (hl_fluid_is_liquid (gas_of ("mineral-oil")) && !hl_fluid_is_liquid (gas_of ("air")) && !hl_fluid_is_liquid (hl_fluid_water ()));
  g_assert_false (hl_fluid_has_dome (gas_of ("mineral-oil")));
  g_assert_false (hl_fluid_is_gas (gas_of ("mineral-oil")));
  hl_fluid_facts (gas_of ("diphenyl-mixture"), &facts);
  g_assert_nonnull (strstr (facts.note, "257 degC"));
  g_assert_cmpint (facts.expansion, ==, HL_EXPANSION_NONE);
}

int
main (int argc, char *argv[])
{
  g_test_init (&argc, &argv, NULL);
  g_test_add_func ("/fluid/liquid-state/pairs", test_pairs_come_back);
  g_test_add_func ("/fluid/liquid-state/laws", test_nothing_contradicts);
  g_test_add_func ("/fluid/liquid-state/pump", test_pumping_takes_volume_times_pressure);
  g_test_add_func ("/fluid/liquid-state/published", test_liquids_agree_with_published_values);
  g_test_add_func ("/fluid/liquid-state/warm", test_warm_liquids_are_thin_and_light);
  g_test_add_func ("/fluid/liquid-state/kind", test_it_is_a_liquid);
  return g_test_run ();
}
