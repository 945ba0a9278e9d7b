/* Times of property calls for media by coefficients, beside water by IAPWS-IF97.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "fluid/fluid-table.h"

#include <math.h>
#include <stdio.h>
#include <time.h>

#define N_STATES 512
#define N_ROUNDS 5
#define TARGET_PH 3000.0        /* ns, for (p,h) of a medium by coefficients */
#define TARGET_TABLE 120.0      /* ns, for (p,h) from its table */

typedef struct {
  const HlFluid *fluid;
  HlState        states[N_STATES];
} Sample;

/* Pressures of a cycle: 0.02 to 0.9 of the critical one below it, 1.1 to 3 above. */
static void
fill (Sample *sample, const char *where)
{
  HlFluidLimits limits;
  HlSaturation sat;
  g_autoptr (GRand) rand = g_rand_new_with_seed (4711);
  hl_fluid_limits (sample->fluid, &limits);
  for (gsize i = 0; i < N_STATES; i++)
    {
      double low = fmax (0.02 * limits.p_critical, 1.05 * limits.p_triple), p = low + (0.9 * limits.p_critical - low) * g_rand_double (rand);
      HlState *state = &sample->states[i];
      HlStatus status = hl_fluid_saturation_p (sample->fluid, p, &sat);
      g_assert_cmpint (status, ==, HL_OK);
      double share = g_rand_double_range (rand, 0.02, 0.98);
      if (where[0] == 'l')
        status = hl_fluid_state_pT (sample->fluid, p, limits.T_min + (sat.T - limits.T_min) * (0.3 + 0.69 * share), state);
      else if (where[0] == 'v')
        status = hl_fluid_state_pT (sample->fluid, p, sat.T + (limits.T_max - sat.T) * share, state);
      else if (where[0] == 'm')
        status = hl_fluid_state_px (sample->fluid, p, share, state);
      else
        {
          p = fmin (limits.p_critical * g_rand_double_range (rand, 1.1, 3.0), limits.p_max);
          status = hl_fluid_state_pT (sample->fluid, p, limits.T_critical * (0.9 + 0.25 * share) < limits.T_max ? limits.T_critical * (0.9 + 0.25 * share) : limits.T_max, state);
        }
      g_assert_cmpint (status, ==, HL_OK);
    }
}

static double
call (const HlFluid *fluid, const char *pair, const HlState *at)
{
  HlState s;
  HlSaturation sat;
  HlStatus status;
  if (g_str_equal (pair, "pT"))
    status = hl_fluid_state_pT (fluid, at->p, at->T, &s);
  else if (g_str_equal (pair, "ph"))
    status = hl_fluid_state_ph (fluid, at->p, at->h, &s);
  else if (g_str_equal (pair, "ps"))
    status = hl_fluid_state_ps (fluid, at->p, at->s, &s);
  else if (g_str_equal (pair, "hs"))
    status = hl_fluid_state_hs (fluid, at->h, at->s, &s);
  else
    {
      status = hl_fluid_saturation_p (fluid, at->p, &sat);
      return status == HL_OK ? sat.T : NAN;
    }
  return status == HL_OK ? s.T : NAN;
}

/* Processor time [ns], which other programs on the machine disturb least. */
static double
now (void)
{
  struct timespec t;
  clock_gettime (CLOCK_PROCESS_CPUTIME_ID, &t);
  return (double) t.tv_sec * 1e9 + (double) t.tv_nsec;
}

/* Least of some rounds: other programs on the machine only ever add. */
static double
time_pair (const Sample *sample, const char *pair)
{
  double best = INFINITY;
  for (int round = 0; round < N_ROUNDS; round++)
    {
      volatile double sum = 0.0;
      double begin = now ();
      for (gsize i = 0; i < N_STATES; i++)
        sum += call (sample->fluid, pair, &sample->states[i]);
      best = fmin (best, (now () - begin) / N_STATES);
      g_assert_true (isfinite (sum));
    }
  return best;
}

/* Gases and liquids have no dome to place states around. */
static void
time_without_dome (void)
{
  static const char *const ids[] = { "air", "gas:N2=0.7,CO2=0.1,H2O=0.15,O2=0.05", "mineral-oil" }, *const pairs[] = { "pT", "ph", "ps", "hs" };
  static Sample sample;
  printf ("\n%-40s        pT        ph        ps        hs\n", "without dome, 1 to 10 bar");
  for (gsize i = 0; i < G_N_ELEMENTS (ids); i++)
    for (int is_wet = 0; is_wet <= (i == 1); is_wet++)
      {
        g_autoptr (GRand) rand = g_rand_new_with_seed (4711);
        sample.fluid = hl_fluid_lookup (ids[i]);
        for (gsize k = 0; k < N_STATES; k++)
          {
            HlStatus status = hl_fluid_state_pT (sample.fluid, g_rand_double_range (rand, 1e5, 10e5),
                                                 is_wet ? g_rand_double_range (rand, 280.0, 320.0) : g_rand_double_range (rand, 400.0, 590.0), &sample.states[k]);
            g_assert_cmpint (status, ==, HL_OK);
          }
        printf ("%-40s", is_wet ? "the same, below the dew point" : ids[i]);
        for (gsize c = 0; c < G_N_ELEMENTS (pairs); c++)
          printf (" %9.0f", time_pair (&sample, pairs[c]));
        printf ("\n");
      }
}

/* The same states from the table; a state that it leaves to the equation counts with both. */
static double
time_table (const Sample *sample, const HlFluidTable *table)
{
  double best = INFINITY;
  for (int round = 0; round < 4 * N_ROUNDS; round++)
    {
      volatile double sum = 0.0;
      double begin = now ();
      for (gsize i = 0; i < N_STATES; i++)
        {
          HlState s;
          if (hl_fluid_table_state_ph (table, sample->states[i].p, sample->states[i].h, &s) == HL_OK
              || hl_fluid_state_ph (sample->fluid, sample->states[i].p, sample->states[i].h, &s) == HL_OK)
            sum += s.T;
        }
      best = fmin (best, (now () - begin) / N_STATES);
      g_assert_true (isfinite (sum));
    }
  return best;
}

static void
time_tables (void)
{
  static const char *const ids[] = { "water-95", "isopentane", "toluene", "r134a", "ammonia", "carbon-dioxide" }, *const wheres[] = { "liquid", "vapour", "mixture", "supercritical" };
  static Sample sample;
  printf ("\n(p,h) from the table; to stay below %g\n%-16s", TARGET_TABLE, "");
  for (gsize c = 0; c < G_N_ELEMENTS (wheres); c++)
    printf (" %13s", wheres[c]);
  printf ("\n");
  for (gsize i = 0; i < G_N_ELEMENTS (ids); i++)
    {
      sample.fluid = hl_fluid_lookup (ids[i]);
      double begin = now ();
      const HlFluidTable *table = hl_fluid_table_wait (sample.fluid);
      double made = (now () - begin) * 1e-6;
      printf ("%-16s", ids[i]);
      for (gsize c = 0; c < G_N_ELEMENTS (wheres); c++)
        {
          fill (&sample, wheres[c]);
          double ns = time_table (&sample, table);
          printf (" %12.0f%c", ns, ns > TARGET_TABLE ? '!' : ' ');
        }
      printf (" made or read in %.0f ms, answers %.2f %%\n", made, 1e2 * hl_fluid_table_coverage (table));
    }
}

int
main (void)
{
  static const char *const ids[] = { "water", "water-95", "isopentane", "toluene", "r134a", "r245fa", "ammonia", "propane", "carbon-dioxide", "mm", "cyclopentane", "r1233zde" };
  static const struct { const char *where, *pair; } columns[] = {
    { "liquid", "ph" }, { "vapour", "ph" }, { "mixture", "ph" }, { "supercritical", "ph" }, { "liquid", "ps" }, { "vapour", "ps" },
    { "vapour", "pT" }, { "liquid", "pT" }, { "vapour", "hs" }, { "mixture", "saturation" },
  };
  static Sample sample;
  printf ("nanoseconds a call; (p,h) is to stay below %g\n%-16s", TARGET_PH, "");
  for (gsize c = 0; c < G_N_ELEMENTS (columns); c++)
    printf (" %6.6s %-4.4s", columns[c].where, columns[c].pair);
  printf ("\n");
  for (gsize i = 0; i < G_N_ELEMENTS (ids); i++)
    {
      double begin = now ();
      sample.fluid = hl_fluid_lookup (ids[i]);
      double load = (now () - begin) * 1e-6;
      printf ("%-16s", ids[i]);
      for (gsize c = 0; c < G_N_ELEMENTS (columns); c++)
        {
          fill (&sample, columns[c].where);
          double ns = time_pair (&sample, columns[c].pair);
          printf (" %10.0f%c", ns, columns[c].pair[1] == 'h' && ns > TARGET_PH ? '!' : ' ');
          fflush (stdout);
        }
      printf (" first look-up %.2f ms\n", load);
    }
  time_tables ();
  time_without_dome ();
  return 0;
}
