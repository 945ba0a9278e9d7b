/* Cycles for tests of the state diagram, made straight from property calls: no plant, no solver.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "cycle-fixtures.h"
#include <math.h>

static HlState
at_pT (double p, double T)
{
  HlState state;
  g_assert_cmpint (hl_fluid_state_pT (hl_fluid_water (), p, T, &state), ==, HL_OK);
  return state;
}

static HlState
at_ph (double p, double h)
{
  HlState state;
  g_assert_cmpint (hl_fluid_state_ph (hl_fluid_water (), p, h, &state), ==, HL_OK);
  return state;
}

static HlState
at_ps (double p, double s)
{
  HlState state;
  g_assert_cmpint (hl_fluid_state_ps (hl_fluid_water (), p, s, &state), ==, HL_OK);
  return state;
}

static HlState
boiling (double p)
{
  HlState state;
  g_assert_cmpint (hl_fluid_state_px (hl_fluid_water (), p, 0.0, &state), ==, HL_OK);
  return state;
}

static HlState
expand (HlState from, double p, double efficiency)
{
  return at_ph (p, from.h - efficiency * (from.h - at_ps (p, from.s).h));
}

static HlState
compress (HlState from, double p, double efficiency)
{
  return at_ph (p, from.h + (at_ps (p, from.s).h - from.h) / efficiency);
}

const HlCyclePoint *
cycle_point (const HlCycle *cycle, guint n)
{
  g_assert_cmpuint (n, <, cycle->points->len);
  return &g_array_index (cycle->points, HlCyclePoint, n);
}

/* Numbered from 1 in the order of adding. */
static guint
add_point (HlCycle *cycle, double m, HlState state)
{
  char id[16];
  HlCyclePoint point = { .stream = (int) cycle->points->len, .m = m, .state = state };
  g_snprintf (id, sizeof id, "%u", cycle->points->len + 1);
  point.id = g_intern_string (id);
  g_array_append_val (cycle->points, point);
  return cycle->points->len - 1;
}

static void
add_process (HlCycle *cycle, HlProcessKind kind, guint from, guint to)
{
  HlProcess process = { .kind = kind, .from_stream = (int) from, .to_stream = (int) to, .fluid = cycle->fluid };
  process.from = cycle_point (cycle, from)->state;
  process.to = cycle_point (cycle, to)->state;
  process.m = fmin (cycle_point (cycle, from)->m, cycle_point (cycle, to)->m);
  if (kind == HL_PROCESS_EXPANSION || kind == HL_PROCESS_COMPRESSION)
    process.has_isentropic = hl_fluid_state_ps (cycle->fluid, process.to.p, process.from.s, &process.isentropic) == HL_OK;
  g_array_append_val (cycle->processes, process);
}

HlCycle *
cycle_simple (HlUnitSet units)
{
  HlCycle *cycle = hl_cycle_new (NULL, units);
  HlState live = at_pT (80e5, 753.15), condensate = boiling (8000.0);
  guint one = add_point (cycle, 12.0, live), two = add_point (cycle, 12.0, expand (live, 8000.0, 0.85));
  guint three = add_point (cycle, 12.0, condensate), four = add_point (cycle, 12.0, compress (condensate, 80e5, 0.75));
  add_process (cycle, HL_PROCESS_EXPANSION, one, two);
  add_process (cycle, HL_PROCESS_COOLING, two, three);
  add_process (cycle, HL_PROCESS_COMPRESSION, three, four);
  add_process (cycle, HL_PROCESS_HEATING, four, one);
  return cycle;
}

HlCycle *
cycle_industry (HlUnitSet units)
{
  HlCycle *cycle = hl_cycle_new (NULL, units);
  HlState live = at_pT (65e5, 758.15), wide = at_ph (62.4e5, live.h), first = expand (wide, 12e5, 0.82), second = expand (first, 6.3e5, 0.82);
  HlState third = expand (second, 2.6e5, 0.83), drain = boiling (11.5e5);
  guint s1 = add_point (cycle, 16.67, live), s2 = add_point (cycle, 16.67, wide), s3 = add_point (cycle, 1.5, first);
  guint s4 = add_point (cycle, 3.89, second), s5 = add_point (cycle, 1.0, third), s6 = add_point (cycle, 10.5, expand (third, 7000.0, 0.83));
  guint s7 = add_point (cycle, 10.5, boiling (7000.0)), s8 = add_point (cycle, 10.5, compress (boiling (7000.0), 3e5, 0.75));
  guint s9 = add_point (cycle, 16.67, boiling (2.5e5)), s10 = add_point (cycle, 16.67, compress (boiling (2.5e5), 82e5, 0.74));
  guint s11 = add_point (cycle, 16.67, at_pT (80e5, 456.15)), s12 = add_point (cycle, 2.7, at_pT (6e5, 358.15));
  guint s13 = add_point (cycle, 1.2, at_pT (3e5, 288.15)), s14 = add_point (cycle, 1.5, drain), s15 = add_point (cycle, 1.5, at_ph (2.5e5, drain.h));
  add_process (cycle, HL_PROCESS_THROTTLING, s1, s2);
  add_process (cycle, HL_PROCESS_EXPANSION, s2, s3);
  add_process (cycle, HL_PROCESS_EXPANSION, s3, s4);
  add_process (cycle, HL_PROCESS_EXPANSION, s4, s5);
  add_process (cycle, HL_PROCESS_EXPANSION, s5, s6);
  add_process (cycle, HL_PROCESS_COOLING, s6, s7);
  add_process (cycle, HL_PROCESS_COMPRESSION, s7, s8);
  add_process (cycle, HL_PROCESS_MIXING, s8, s9);
  add_process (cycle, HL_PROCESS_MIXING, s5, s9);
  add_process (cycle, HL_PROCESS_MIXING, s12, s9);
  add_process (cycle, HL_PROCESS_MIXING, s13, s9);
  add_process (cycle, HL_PROCESS_MIXING, s15, s9);
  add_process (cycle, HL_PROCESS_COMPRESSION, s9, s10);
  add_process (cycle, HL_PROCESS_HEATING, s10, s11);
  add_process (cycle, HL_PROCESS_HEATING, s11, s1);
  add_process (cycle, HL_PROCESS_COOLING, s3, s14);
  add_process (cycle, HL_PROCESS_THROTTLING, s14, s15);
  add_process (cycle, HL_PROCESS_COOLING, s4, s12);
  return cycle;
}

/* Drain of the heater that the state @from feeds, and its throttling to the pressure of the next one. */
static void
add_drain (HlCycle *cycle, guint from, guint next)
{
  double m = cycle_point (cycle, from)->m, p = 0.96 * cycle_point (cycle, from)->state.p;
  HlState drain = at_ph (p, boiling (p).h - 2e4);
  guint cool = add_point (cycle, m, drain);
  add_process (cycle, HL_PROCESS_COOLING, from, cool);
  if (next != from)
    add_process (cycle, HL_PROCESS_THROTTLING, cool, add_point (cycle, m, at_ph (0.96 * cycle_point (cycle, next)->state.p, drain.h)));
}

HlCycle *
cycle_reheat (HlUnitSet units, double p, double T)
{
  static const struct { double p, efficiency; } groups[] = {
    { 20.5e5, 0.91 }, { 9.6e5, 0.91 }, { 4.3e5, 0.89 }, { 1.95e5, 0.89 }, { 0.8e5, 0.88 }, { 0.26e5, 0.86 }, { 5500.0, 0.8 },
  };
  static const double feed_T[] = { 335.0, 362.0, 388.0, 415.0 };
  HlCycle *cycle = hl_cycle_new (NULL, units);
  guint live = add_point (cycle, 247.0, at_pT (p, T)), cold = add_point (cycle, 222.0, expand (at_pT (p, T), 42e5, 0.87));
  guint hot = add_point (cycle, 222.0, at_pT (38e5, T)), last = hot, group[G_N_ELEMENTS (groups)], pumped;
  add_process (cycle, HL_PROCESS_EXPANSION, live, cold);
  add_process (cycle, HL_PROCESS_HEATING, cold, hot);
  for (guint i = 0; i < G_N_ELEMENTS (groups); i++)
    {
      group[i] = add_point (cycle, i + 1 < G_N_ELEMENTS (groups) ? 9.0 : 160.0, expand (cycle_point (cycle, last)->state, groups[i].p, groups[i].efficiency));
      add_process (cycle, HL_PROCESS_EXPANSION, last, group[i]);
      last = group[i];
    }
  pumped = add_point (cycle, 190.0, boiling (5500.0));
  add_process (cycle, HL_PROCESS_COOLING, last, pumped);
  last = add_point (cycle, 190.0, compress (boiling (5500.0), 22e5, 0.8));
  add_process (cycle, HL_PROCESS_COMPRESSION, pumped, last);
  for (guint i = 0; i < G_N_ELEMENTS (feed_T); i++)
    {
      guint next = add_point (cycle, 190.0, at_pT (21e5 - 1e5 * i, feed_T[i]));
      add_process (cycle, HL_PROCESS_HEATING, last, next);
      last = next;
    }
  pumped = add_point (cycle, 247.0, boiling (9.1e5));
  add_process (cycle, HL_PROCESS_MIXING, last, pumped);
  add_process (cycle, HL_PROCESS_MIXING, group[1], pumped);
  last = add_point (cycle, 247.0, compress (boiling (9.1e5), 1.15 * p, 0.83));
  add_process (cycle, HL_PROCESS_COMPRESSION, pumped, last);
  pumped = add_point (cycle, 247.0, at_pT (1.13 * p, 523.9));
  add_process (cycle, HL_PROCESS_HEATING, last, pumped);
  add_process (cycle, HL_PROCESS_HEATING, pumped, live);
  add_drain (cycle, cold, group[0]);
  add_drain (cycle, group[0], group[1]);
  for (guint i = 2; i < 6; i++)
    add_drain (cycle, group[i], i < 5 ? group[i + 1] : group[i]);
  return cycle;
}

HlCycle *
cycle_random (guint32 seed, guint n)
{
  GRand *random = g_rand_new_with_seed (seed);
  HlCycle *cycle = hl_cycle_new (NULL, (HlUnitSet) g_rand_int_range (random, 0, HL_N_UNIT_SETS));
  while (cycle->points->len < n)
    {
      double p = exp (g_rand_double_range (random, log (3000.0), log (250e5))), h = g_rand_double_range (random, 5e4, 3.6e6);
      HlState state;
      if (hl_fluid_state_ph (cycle->fluid, p, h, &state) == HL_OK && state.T < 973.15)
        add_point (cycle, g_rand_double_range (random, 0.1, 100.0), state);
    }
  for (guint i = 0; i + 1 < n; i++)
    {
      const HlState *a = &cycle_point (cycle, i)->state, *b = &cycle_point (cycle, i + 1)->state;
      HlProcessKind kind = (HlProcessKind) g_rand_int_range (random, HL_PROCESS_HEATING, HL_PROCESS_LINE + 1);
      if (kind == HL_PROCESS_THROTTLING || (b->p < a->p && b->s > a->s))
        kind = HL_PROCESS_EXPANSION;
      add_process (cycle, kind, i, i + 1);
    }
  g_rand_free (random);
  return cycle;
}
