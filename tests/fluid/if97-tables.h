/* Checks one printed table of a property equation against a function, row by row.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#pragma once
#include "csv.h"
#include "fluid/if97-private.h"
G_BEGIN_DECLS

/* Expects T and p (or rho) as inputs and v h u s cp w (or p h u s cp w) as results, 9 printed digits. */
static inline void
check_property_table (const char *file, const char *second, double second_unit,
                      void (*region) (double second, double T, HlState *state))
{
  g_autoptr (Csv) csv = csv_read ("fluid", "data", file, NULL);
  for (guint i = 0; i < csv_n_rows (csv); i++)
    {
      HlState state;
      region (csv_number (csv, i, second) * second_unit, csv_number (csv, i, "T[K]"), &state);
      if (csv_has_column (csv, "v[m3/kg]"))
        csv_assert_prints (csv, i, "v[m3/kg]", state.v, 0.5);
      else
        csv_assert_prints (csv, i, "p[MPa]", state.p / 1e6, 0.5);
      csv_assert_prints (csv, i, "h[kJ/kg]", state.h / 1e3, 0.5);
      csv_assert_prints (csv, i, "u[kJ/kg]", state.u / 1e3, 0.5);
      csv_assert_prints (csv, i, "s[kJ/(kg K)]", state.s / 1e3, 0.5);
      csv_assert_prints (csv, i, "cp[kJ/(kg K)]", state.cp / 1e3, 0.5);
      csv_assert_prints (csv, i, "w[m/s]", state.w, 0.5);
    }
}

/* A function of two arguments, or of one (then b is NULL), by rows; rows whose
 * cell in the column of names differs from the name are left to other functions. */
typedef struct {
  const char *name;               /* cell that selects the row; NULL takes all */
  double    (*of_two) (double a, double b);
  double    (*of_one) (double a);
} TableFunction;

static inline void
check_function_table (const char *file, const char *names, const TableFunction *functions, gsize n,
                      const char *a, double a_unit, const char *b, double b_unit,
                      const char *result, double result_unit)
{
  g_autoptr (Csv) csv = csv_read ("fluid", "data", file, NULL);
  for (guint i = 0; i < csv_n_rows (csv); i++)
    {
      const TableFunction *f = NULL;
      for (gsize k = 0; k < n; k++)
        if (names == NULL || g_str_equal (csv_text (csv, i, names), functions[k].name))
          f = &functions[k];
      g_assert_nonnull (f);
      double x = csv_number (csv, i, a) * a_unit;
      double value = b != NULL ? f->of_two (x, csv_number (csv, i, b) * b_unit) : f->of_one (x);
      csv_assert_prints (csv, i, result, value / result_unit, 0.5);
    }
}

G_END_DECLS
