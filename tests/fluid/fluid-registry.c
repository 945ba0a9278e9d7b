/* Looking media up: ids, threads, other zeros of enthalpy and entropy; (density,T) for water.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "fluid/helmholtz-private.h"
#include "media.h"

static void
test_media_are_found (void)
{
  g_auto (GStrv) ids = hl_fluid_list ();
  g_assert_cmpuint (g_strv_length (ids), ==, 46);
  for (guint i = 0; ids[i] != NULL; i++)
    {
      const HlFluid *fluid = hl_fluid_lookup (ids[i]);
      g_assert_nonnull (fluid);
      g_assert_cmpstr (hl_fluid_id (fluid), ==, ids[i]);
      g_assert_true (hl_fluid_lookup (ids[i]) == fluid);
      g_assert_cmpint (strlen (hl_fluid_formulation (fluid)), >, 8);
    }
}

static void
test_unknown_ids_are_not (void)
{
  static const char *const ids[] = { "unobtainium", "", "../secret", "isopentane.json", "isopentane@", "isopentane@XYZ", "@IIR", "unobtainium@NBP", "water@IIR" };
  for (gsize i = 0; i < G_N_ELEMENTS (ids); i++)
    g_assert_null (hl_fluid_lookup (ids[i]));
  g_assert_null (hl_fluid_lookup (NULL));
}

/* The definitions: IIR h = 200 kJ/kg, s = 1 kJ/(kg K) at 273.15 K, NBP and ASHRAE 0 at 101325 Pa and 233.15 K, saturated liquid. */
static void
check_zero (const HlFluid *fluid, HlReference reference, const char *word)
{
  HlState at, plain, moved;
  const HlFluid *other = hl_fluid_with_reference (fluid, reference);
  g_autofree char *id = g_strdup_printf ("%s@%s", hl_fluid_id (fluid), word);
  HlStatus status = reference == HL_REFERENCE_NBP ? hl_fluid_state_px (fluid, 101325.0, 0.0, &at)
                                                  : hl_fluid_state_Tx (fluid, reference == HL_REFERENCE_IIR ? 273.15 : 233.15, 0.0, &at);
  g_assert_true ((status == HL_OK) == (other != NULL));
  g_assert_true (hl_fluid_lookup (id) == other);
  if (other == NULL)
    return;
  g_assert_true (hl_fluid_with_reference (other, HL_REFERENCE_PUBLISHED) == fluid);
  g_assert_true (hl_fluid_with_reference (other, reference) == other);
  HlFluidLimits limits;
  hl_fluid_limits (fluid, &limits);
  double h0 = reference == HL_REFERENCE_IIR ? 200e3 : 0.0, s0 = reference == HL_REFERENCE_IIR ? 1e3 : 0.0;
  g_assert_cmpint (hl_fluid_state_Tx (other, at.T, 0.0, &moved), ==, HL_OK);
  g_assert_cmpfloat_with_epsilon (moved.h, h0, 1e-4);
  g_assert_cmpfloat_with_epsilon (moved.s, s0, 1e-6);
  /* Differences stay, and the flashes work from the moved values. */
  double p = 0.3 * limits.p_critical, T = 0.5 * (limits.T_critical + limits.T_max);
  g_assert_cmpint (hl_fluid_state_pT (fluid, p, T, &plain), ==, HL_OK);
  g_assert_cmpint (hl_fluid_state_ph (other, p, plain.h - at.h + h0, &moved), ==, HL_OK);
  assert_near (other, "T", p, T, moved.T, T, 1e-10, 0.0);
  assert_near (other, "s", p, T, moved.s - s0, plain.s - at.s, 1e-10, 1e3);
  p = 1.5 * limits.p_critical;
  g_assert_cmpint (hl_fluid_state_pT (fluid, p, T, &plain), ==, HL_OK);
  g_assert_cmpint (hl_fluid_state_ps (other, p, plain.s - at.s + s0, &moved), ==, HL_OK);
  assert_near (other, "T", p, T, moved.T, T, 1e-10, 0.0);
}

static void
test_zeros_are_where_they_belong (void)
{
  g_auto (GStrv) ids = all_media ();
  for (guint i = 0; ids[i] != NULL; i++)
    {
      const HlFluid *fluid = hl_fluid_lookup (ids[i]);
      check_zero (fluid, HL_REFERENCE_IIR, "IIR");
      check_zero (fluid, HL_REFERENCE_NBP, "NBP");
      check_zero (fluid, HL_REFERENCE_ASHRAE, "ASHRAE");
    }
  g_assert_null (hl_fluid_with_reference (hl_fluid_water (), HL_REFERENCE_IIR));
  g_assert_true (hl_fluid_with_reference (hl_fluid_water (), HL_REFERENCE_PUBLISHED) == hl_fluid_water ());
}

/* The authors of most refrigerant equations chose the IIR zero, those of many hydrocarbon equations NBP: their constants must give it. */
static void
test_published_zeros_are_those_named (void)
{
  g_auto (GStrv) ids = all_media ();
  guint n = 0;
  for (guint i = 0; ids[i] != NULL; i++)
    {
      const HlFluid *fluid = hl_fluid_lookup (ids[i]);
      const char *zero = hl_helmholtz_of (fluid)->zero;
      HlState at;
      gboolean is_iir = g_strcmp0 (zero, "IIR") == 0;
      if (!is_iir && g_strcmp0 (zero, "NBP") != 0)
        continue;
      if (is_iir)
        g_assert_cmpint (hl_fluid_state_Tx (fluid, 273.15, 0.0, &at), ==, HL_OK);
      else
        g_assert_cmpint (hl_fluid_state_px (fluid, 101325.0, 0.0, &at), ==, HL_OK);
      /* Their constants are printed with some ten digits: 0.2 kJ/kg at worst. */
      g_assert_cmpfloat_with_epsilon (at.h, is_iir ? 200e3 : 0.0, 200.0);
      g_assert_cmpfloat_with_epsilon (at.s, is_iir ? 1e3 : 0.0, 1.0);
      n++;
    }
  g_assert_cmpuint (n, >, 25);
}

static gpointer
look_up_all (gpointer data G_GNUC_UNUSED)
{
  g_auto (GStrv) ids = hl_fluid_list ();
  gsize sum = 0;
  for (guint i = 0; ids[i] != NULL; i++)
    sum += (gsize) hl_fluid_lookup (ids[i]) * (i + 1);
  return GSIZE_TO_POINTER (sum);
}

/* Must run first: threads that ask for media nobody asked for yet get the same ones. */
static void
test_threads_find_the_same (void)
{
  GThread *threads[6];
  for (gsize i = 0; i < G_N_ELEMENTS (threads); i++)
    threads[i] = g_thread_new ("look-up", look_up_all, NULL);
  gpointer first = g_thread_join (threads[0]);
  for (gsize i = 1; i < G_N_ELEMENTS (threads); i++)
    g_assert_true (g_thread_join (threads[i]) == first);
}

/* Water has no equation in density outside region 3: the search must come back to where (p,T) was. */
static void
test_density_of_water_round_trips (void)
{
  const HlFluid *water = hl_fluid_water ();
  g_autoptr (GRand) rand = g_rand_new_with_seed (5);
  for (int i = 0; i < 2000; i++)
    {
      HlState there, back;
      double T = g_rand_double_range (rand, 273.2, 1273.0), p = exp (g_rand_double_range (rand, log (1e3), log (49e6)));
      g_assert_cmpint (hl_fluid_state_pT (water, p, T, &there), ==, HL_OK);
      g_assert_cmpint (hl_fluid_state_dT (water, 1.0 / there.v, T, &back), ==, HL_OK);
      assert_near (water, "v", p, T, back.v, there.v, 1e-10, 0.0);
      assert_near (water, "h", p, T, back.h, there.h, 1e-9, 1e5);
    }
  HlState wet, back;
  g_assert_cmpint (hl_fluid_state_Tx (water, 450.0, 0.3, &wet), ==, HL_OK);
  g_assert_cmpint (hl_fluid_state_dT (water, 1.0 / wet.v, 450.0, &back), ==, HL_OK);
  assert_near (water, "x", wet.p, 450.0, back.x, 0.3, 1e-12, 0.0);
  g_assert_cmpint (hl_fluid_state_dT (water, 1200.0, 300.0, &back), ==, HL_OUTSIDE_RANGE);
  g_assert_cmpint (hl_fluid_state_dT (water, 200.0, 1200.0, &back), ==, HL_OUTSIDE_RANGE);
  g_assert_cmpint (hl_fluid_state_dT (water, 900.0, 200.0, &back), ==, HL_OUTSIDE_RANGE);
  g_assert_cmpint (hl_fluid_state_dT (water, -1.0, 300.0, &back), ==, HL_OUTSIDE_RANGE);
  g_assert_cmpint (hl_fluid_state_dT (water, NAN, 300.0, &back), ==, HL_OUTSIDE_RANGE);
}

int
main (int argc, char *argv[])
{
  g_test_init (&argc, &argv, NULL);
  g_test_add_func ("/fluid/fluid-registry/threads", test_threads_find_the_same);
  g_test_add_func ("/fluid/fluid-registry/found", test_media_are_found);
  g_test_add_func ("/fluid/fluid-registry/unknown", test_unknown_ids_are_not);
  g_test_add_func ("/fluid/fluid-registry/zeros", test_zeros_are_where_they_belong);
  g_test_add_func ("/fluid/fluid-registry/published-zeros", test_published_zeros_are_those_named);
  g_test_add_func ("/fluid/fluid-registry/density-of-water", test_density_of_water_round_trips);
  return g_test_run ();
}
