/* Region 1 of IAPWS-IF97 against the release's own table.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "if97-tables.h"

/* IAPWS R7-97(2012), Table 5, all printed digits. */
static void
test_region1_agrees_with_table5 (void)
{
  check_property_table ("if97-r1-table5.csv", "p[MPa]", 1e6, hl_if97_region1);
}

/* What the iterations for T use must be the same function. */
static void
test_calorics_agree_with_state (void)
{
  g_autoptr (Csv) csv = csv_read ("fluid", "data", "if97-r1-table5.csv", NULL);
  for (guint i = 0; i < csv_n_rows (csv); i++)
    {
      double p = csv_number (csv, i, "p[MPa]") * 1e6, T = csv_number (csv, i, "T[K]"), cp;
      HlState state;
      hl_if97_region1 (p, T, &state);
      g_assert_cmpfloat_with_epsilon (hl_if97_region1_enthalpy (p, T, &cp) / state.h, 1.0, 1e-12);
      g_assert_cmpfloat_with_epsilon (cp / state.cp, 1.0, 1e-12);
      g_assert_cmpfloat_with_epsilon (hl_if97_region1_entropy (p, T, &cp) / state.s, 1.0, 1e-12);
      g_assert_cmpfloat_with_epsilon (cp / state.cp, 1.0, 1e-12);
    }
}

static void
assert_near (double value, double expected)
{
  g_assert_cmpfloat_with_epsilon (value / expected, 1.0, 1e-11);
}

static void
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
static void
test_last_step_meets_the_state (void)
{
  g_autoptr (Csv) csv = csv_read ("fluid", "data", "if97-r1-table5.csv", NULL);
  for (guint i = 0; i < csv_n_rows (csv); i++)
    for (double off = -5e-5; off <= 5e-5; off += 5e-5)
      {
        double p = csv_number (csv, i, "p[MPa]") * 1e6, T = csv_number (csv, i, "T[K]");
        HlState state, by_h, by_s;
        hl_if97_region1 (p, T, &state);
        hl_if97_region1_at_h (p, T + off, state.h, 1e-9, &by_h);
        hl_if97_region1_at_s (p, T + off, state.s, 1e-9, &by_s);
        assert_same_state (&by_h, &state);
        assert_same_state (&by_s, &state);
      }
}

int
main (int argc, char *argv[])
{
  g_test_init (&argc, &argv, NULL);
  g_test_add_func ("/fluid/if97-region1/table5", test_region1_agrees_with_table5);
  g_test_add_func ("/fluid/if97-region1/calorics", test_calorics_agree_with_state);
  g_test_add_func ("/fluid/if97-region1/last-step", test_last_step_meets_the_state);
  return g_test_run ();
}
