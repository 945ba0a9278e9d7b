/* Checks that the regions with a Gibbs equation share.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#pragma once
#include "if97-tables.h"
G_BEGIN_DECLS

/* A region with a Gibbs equation: the state, its parts for the iterations for T, and the last step to a given h or s. */
typedef struct {
  const char *table;
  void      (*state)    (double p, double T, HlState *state);
  double    (*enthalpy) (double p, double T, double *cp);
  double    (*entropy)  (double p, double T, double *cp);
  double    (*at_h)     (double p, double T, double h, double most_left, HlState *state);
  double    (*at_s)     (double p, double T, double s, double most_left, HlState *state);
} GibbsRegion;

/* What the iterations for T use must be the same function. */
static inline void
check_calorics (const GibbsRegion *region)
{
  g_autoptr (Csv) csv = csv_read ("fluid", "data", region->table, NULL);
  for (guint i = 0; i < csv_n_rows (csv); i++)
    {
      double p = csv_number (csv, i, "p[MPa]") * 1e6, T = csv_number (csv, i, "T[K]"), cp;
      HlState state;
      region->state (p, T, &state);
      g_assert_cmpfloat_with_epsilon (region->enthalpy (p, T, &cp) / state.h, 1.0, 1e-12);
      g_assert_cmpfloat_with_epsilon (cp / state.cp, 1.0, 1e-12);
      g_assert_cmpfloat_with_epsilon (region->entropy (p, T, &cp) / state.s, 1.0, 1e-12);
      g_assert_cmpfloat_with_epsilon (cp / state.cp, 1.0, 1e-12);
    }
}

static inline void
assert_near (double value, double expected)
{
  g_assert_cmpfloat_with_epsilon (value / expected, 1.0, 1e-11);
}

static inline void
assert_same_state (const HlState *a, const HlState *b)
{
  assert_near (a->T, b->T);
  assert_near (a->h, b->h);
  assert_near (a->s, b->s);
  assert_near (a->v, b->v);
  assert_near (a->u, b->u);
  assert_near (a->cp, b->cp);
  assert_near (a->cv, b->cv);
  assert_near (a->w, b->w);
  assert_near (a->T_p, b->T_p);
  assert_near (a->T_h, b->T_h);
  assert_near (a->s_p, b->s_p);
  assert_near (a->v_p, b->v_p);
  assert_near (a->v_h, b->v_h);
}

/* The last step to a given h or s, from 5e-5 K away (the most that Newton's
 * step from a backward equation leaves), must end in the same state, all of it. */
static inline void
check_last_step (const GibbsRegion *region)
{
  g_autoptr (Csv) csv = csv_read ("fluid", "data", region->table, NULL);
  for (guint i = 0; i < csv_n_rows (csv); i++)
    for (double off = -5e-5; off <= 5e-5; off += 5e-5)
      {
        double p = csv_number (csv, i, "p[MPa]") * 1e6, T = csv_number (csv, i, "T[K]");
        HlState state, by_h, by_s;
        region->state (p, T, &state);
        region->at_h (p, T + off, state.h, 1e-9, &by_h);
        region->at_s (p, T + off, state.s, 1e-9, &by_s);
        assert_same_state (&by_h, &state);
        assert_same_state (&by_s, &state);
      }
}
G_END_DECLS
