/* Times the property calls of water and steam, beside a floor of plain arithmetic and beside python3-iapws.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "fluid/if97-private.h"

#include <math.h>
#include <stdio.h>
#include <string.h>

#define N_STATES 512
#define LEAST_SECONDS 0.002
#define N_REPEATS 100

/* States that the calls run through; a and b are the pair's arguments. */
typedef struct { double a[N_STATES], b[N_STATES]; } Pairs;

static volatile double sink;

typedef double (*Call) (double a, double b);

/* Best of some runs, each long enough for the clock: the rest is other programs' time. */
static double
time_call (Call call, const Pairs *pairs)
{
  double best = INFINITY;
  for (int repeat = 0; repeat < N_REPEATS; repeat++)
    {
      gint64 start = g_get_monotonic_time (), now = start;
      guint64 n = 0;
      double sum = 0.0;
      while (now - start < (gint64) (LEAST_SECONDS * 1e6))
        {
          for (gsize i = 0; i < N_STATES; i++)
            sum += call (pairs->a[i], pairs->b[i]);
          n += N_STATES;
          now = g_get_monotonic_time ();
        }
      sink = sum;
      best = fmin (best, (now - start) * 1e3 / n);
    }
  return best;
}

/* The least that an equation of this kind costs: 34 products with three sums
 * each, over powers made by squaring, with no division, root or logarithm. */
static double
floor_ladder (double a, double b)
{
  double x = a * 1e-9, y = b * 1e-3, power[34], s0 = 0.0, s1 = 0.0, s2 = 0.0;
  power[0] = 1.0;
  power[1] = x + y;
#pragma GCC unroll 34
  for (int k = 2; k < 34; k++)
    power[k] = power[k / 2] * power[k - k / 2];
#pragma GCC unroll 34
  for (int k = 0; k < 34; k++)
    {
      s0 += 1.25 * power[k];
      s1 += (1.25 + k) * power[k];
      s2 += (1.25 - k) * power[k];
    }
  return s0 + s1 + s2;
}

static double
floor_pow (double a, double b)
{
  double x = a * 1e-9, y = b * 1e-3, sum = 0.0;
  for (int k = 0; k < 34; k++)
    sum += pow (x, k) * pow (y, k);
  return sum;
}

static double region1 (double p, double T) { HlState s; hl_if97_region1 (p, T, &s); return s.h + s.v_p; }
static double region2 (double p, double T) { HlState s; hl_if97_region2 (p, T, &s); return s.h + s.v_p; }
static double region3 (double d, double T) { HlState s; hl_if97_region3 (d, T, &s); return s.h + s.v_p; }
static double region5 (double p, double T) { HlState s; hl_if97_region5 (p, T, &s); return s.h + s.v_p; }

#define PUBLIC_CALL(pair) \
  static double \
  call_##pair (double a, double b) \
  { \
    HlState s; \
    return hl_fluid_state_##pair (hl_fluid_water (), a, b, &s) == HL_OK ? s.T + s.v_p : NAN; \
  }
PUBLIC_CALL (pT)
PUBLIC_CALL (ph)
PUBLIC_CALL (ps)
PUBLIC_CALL (hs)
PUBLIC_CALL (px)
PUBLIC_CALL (Tx)

static double
call_saturation_p (double p, double unused G_GNUC_UNUSED)
{
  HlSaturation s;
  return hl_fluid_saturation_p (hl_fluid_water (), p, &s) == HL_OK ? s.T + s.v_vapour_p : NAN;
}

static double
call_Tsat (double p, double unused G_GNUC_UNUSED)
{
  return hl_if97_Tsat (p);
}

/* Where the states of one family lie: p or density [Pa, kg/m3] by T or x. */
typedef enum { BOX_1, BOX_2, BOX_3, BOX_4, BOX_5, BOX_DENSITY, N_BOXES } Box;
static const struct { const char *words; double low_a, high_a, low_b, high_b; } boxes[N_BOXES] = {
  [BOX_1] = { "liquid", 4e6, 40e6, 290.0, 520.0 },
  [BOX_2] = { "steam", 0.05e6, 15e6, 630.0, 1000.0 },
  [BOX_3] = { "region 3", 24e6, 60e6, 630.0, 680.0 },
  [BOX_4] = { "mixture", 0.004e6, 15e6, 0.02, 0.98 },
  [BOX_5] = { "region 5", 0.05e6, 40e6, 1100.0, 2200.0 },
  [BOX_DENSITY] = { "region 3", 150.0, 600.0, 630.0, 700.0 },
};

/* What the b argument becomes for each pair of the same states. */
static void
fill (Box box, const char *pair, Pairs *pairs)
{
  g_autoptr (GRand) rand = g_rand_new_with_seed (4711);
  for (gsize i = 0; i < N_STATES; i++)
    {
      double a = g_rand_double_range (rand, boxes[box].low_a, boxes[box].high_a);
      double b = g_rand_double_range (rand, boxes[box].low_b, boxes[box].high_b);
      HlState s = { .p = a, .T = b };
      if (box == BOX_4)
        g_assert_cmpint (hl_fluid_state_px (hl_fluid_water (), a, b, &s), ==, HL_OK);
      else if (box != BOX_DENSITY)
        g_assert_cmpint (hl_fluid_state_pT (hl_fluid_water (), a, b, &s), ==, HL_OK);
      pairs->a[i] = pair[0] == 'p' ? s.p : pair[0] == 'h' ? s.h : s.T;
      pairs->b[i] = pair[1] == 'T' ? s.T : pair[1] == 'h' ? s.h : pair[1] == 's' ? s.s : s.x;
    }
}

/* The other package's nanoseconds for the same kind of call, by one run of its
 * interpreter; lines "key value".  NULL where it is not installed. */
static char *
run_python (void)
{
  static const char script[] =
    "import sys, time, random\n"
    "from iapws import IAPWS97\n"
    "from iapws.iapws97 import _Region1, _Region2, _Region3, _Region5, _Backward1_T_Ph, _Backward2a_T_Ph, _TSat_P\n"
    "random.seed(4711)\n"
    "def run(key, f, n):\n"
    "    best = 1e9\n"
    "    for r in range(3):\n"
    "        t = time.process_time()\n"
    "        for i in range(n): f()\n"
    "        best = min(best, (time.process_time() - t) / n)\n"
    "    print(key, best * 1e9)\n"
    "u = random.uniform\n"
    "run('region1', lambda: _Region1(u(290, 520), u(4, 40)), 300)\n"
    "run('region2', lambda: _Region2(u(630, 1000), u(0.05, 15)), 300)\n"
    "run('region3', lambda: _Region3(u(150, 600), u(630, 700)), 300)\n"
    "run('region5', lambda: _Region5(u(1100, 2200), u(0.05, 40)), 300)\n"
    "run('start1', lambda: _Backward1_T_Ph(u(4, 40), u(500, 1000)), 300)\n"
    "run('start2', lambda: _Backward2a_T_Ph(u(0.05, 4), u(3100, 3900)), 300)\n"
    "run('Tsat', lambda: _TSat_P(u(0.004, 15)), 300)\n"
    "run('pT1', lambda: IAPWS97(P=u(4, 40), T=u(290, 520)), 20)\n"
    "run('pT2', lambda: IAPWS97(P=u(0.05, 15), T=u(630, 1000)), 20)\n"
    "run('pT3', lambda: IAPWS97(P=u(24, 60), T=u(630, 680)), 20)\n"
    "run('pT5', lambda: IAPWS97(P=u(0.05, 40), T=u(1100, 2200)), 20)\n"
    "run('ph1', lambda: IAPWS97(P=u(4, 40), h=u(150, 1000)), 20)\n"
    "run('ph2', lambda: IAPWS97(P=u(0.05, 5), h=u(3150, 3900)), 20)\n"
    "run('ph3', lambda: IAPWS97(P=u(24, 60), h=u(1750, 2200)), 20)\n"
    "run('ph4', lambda: IAPWS97(P=u(0.004, 10), h=u(1500, 2400)), 20)\n"
    "run('ps1', lambda: IAPWS97(P=u(4, 40), s=u(0.6, 2.5)), 20)\n"
    "run('ps2', lambda: IAPWS97(P=u(0.05, 5), s=u(7.2, 8)), 20)\n"
    "run('px4', lambda: IAPWS97(P=u(0.004, 10), x=u(0.1, 0.9)), 20)\n"
    "run('hs2', lambda: IAPWS97(h=u(3300, 3500), s=u(6.5, 7)), 20)\n";
  char *argv[] = { "/usr/bin/python3", "-W", "ignore", "-c", (char *) script, NULL };
  char *text = NULL;
  int status;
  if (!g_spawn_sync (NULL, argv, NULL, G_SPAWN_STDERR_TO_DEV_NULL, NULL, NULL, &text, NULL, &status, NULL) || status != 0)
    g_clear_pointer (&text, g_free);
  return text;
}

static double
python_time (const char *text, const char *key)
{
  g_auto (GStrv) lines = g_strsplit (text != NULL ? text : "", "\n", -1);
  for (gsize i = 0; lines[i] != NULL; i++)
    if (g_str_has_prefix (lines[i], key) && lines[i][strlen (key)] == ' ')
      return g_ascii_strtod (lines[i] + strlen (key), NULL);
  return NAN;
}

int
main (void)
{
  static const struct { const char *words; Call call; Box box; const char *pair, *python; double target; } rows[] = {
    { "floor: ladder, 34 terms, 3 sums", floor_ladder, BOX_1, "pT", "", NAN },
    { "floor: 34 terms with pow()", floor_pow, BOX_1, "pT", "", NAN },
    { "region 1 forward, derivatives", region1, BOX_1, "pT", "region1", 70.0 },
    { "region 2 forward, derivatives", region2, BOX_2, "pT", "region2", 105.0 },
    { "region 3 forward, derivatives", region3, BOX_DENSITY, "pT", "region3", NAN },
    { "region 5 forward, derivatives", region5, BOX_5, "pT", "region5", NAN },
    { "start T(p,h) region 1", hl_if97_T_ph_1, BOX_1, "ph", "start1", 22.5 },
    { "start T(p,h) region 2a", hl_if97_T_ph_2a, BOX_2, "ph", "start2", 22.5 },
    { "Tsat(p)", call_Tsat, BOX_4, "px", "Tsat", NAN },
    { "state (p,T) liquid", call_pT, BOX_1, "pT", "pT1", NAN },
    { "state (p,T) steam", call_pT, BOX_2, "pT", "pT2", NAN },
    { "state (p,T) region 3", call_pT, BOX_3, "pT", "pT3", NAN },
    { "state (p,T) region 5", call_pT, BOX_5, "pT", "pT5", NAN },
    { "state (p,h) liquid", call_ph, BOX_1, "ph", "ph1", 150.0 },
    { "state (p,h) steam", call_ph, BOX_2, "ph", "ph2", 150.0 },
    { "state (p,h) region 3", call_ph, BOX_3, "ph", "ph3", NAN },
    { "state (p,h) region 5", call_ph, BOX_5, "ph", "", NAN },
    { "state (p,h) mixture", call_ph, BOX_4, "ph", "ph4", NAN },
    { "state (p,s) liquid", call_ps, BOX_1, "ps", "ps1", NAN },
    { "state (p,s) steam", call_ps, BOX_2, "ps", "ps2", NAN },
    { "state (p,s) region 3", call_ps, BOX_3, "ps", "", NAN },
    { "state (p,s) mixture", call_ps, BOX_4, "ps", "", NAN },
    { "state (h,s) liquid", call_hs, BOX_1, "hs", "", NAN },
    { "state (h,s) steam", call_hs, BOX_2, "hs", "hs2", NAN },
    { "state (h,s) region 3", call_hs, BOX_3, "hs", "", NAN },
    { "state (h,s) mixture", call_hs, BOX_4, "hs", "", NAN },
    { "state (p,x) mixture", call_px, BOX_4, "px", "px4", NAN },
    { "state (T,x) mixture", call_Tx, BOX_4, "Tx", "", NAN },
    { "saturation(p)", call_saturation_p, BOX_4, "px", "", NAN },
  };
  g_autofree char *python = run_python ();
  if (python == NULL)
    printf ("python3-iapws is not installed: no comparison\n");
  printf ("%-34s %9s %9s %14s %9s\n", "call", "ns", "target", "python3-iapws", "ratio");
  for (gsize i = 0; i < G_N_ELEMENTS (rows); i++)
    {
      static Pairs pairs;
      fill (rows[i].box, rows[i].pair, &pairs);
      double ns = time_call (rows[i].call, &pairs), other = python_time (python, rows[i].python);
      printf ("%-34s %9.1f", rows[i].words, ns);
      if (isnan (rows[i].target))
        printf (" %9s", "-");
      else
        printf (" %9.1f", rows[i].target);
      if (isnan (other))
        printf (" %14s %9s\n", "-", "-");
      else
        printf (" %14.0f %9.0f\n", other, other / ns);
      fflush (stdout);
    }
  return 0;
}
