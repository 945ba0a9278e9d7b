/* What the tests of gases share: reading the table of published values, making a gas by its id.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#pragma once
#include <math.h>
#include <string.h>

#include "fluid/gas.h"

static inline const HlFluid *
gas_of (const char *id)
{
  g_autoptr (GError) error = NULL;
  const HlFluid *fluid = hl_fluid_find (id, &error);
  g_assert_no_error (error);
  return fluid;
}

/* Rows "kind,subject,at,value,unit,tolerance,source" of data/published-gases.csv; the source may hold commas. */
typedef void (*PublishedCheck) (const char *subject, const char *at, double value, double tolerance, const char *source);

static inline guint
check_published (const char *kind, PublishedCheck check)
{
  g_autofree char *path = g_test_build_filename (G_TEST_DIST, "fluid", "data", "published-gases.csv", NULL), *text = NULL;
  guint n = 0;
  g_assert_true (g_file_get_contents (path, &text, NULL, NULL));
  g_auto (GStrv) lines = g_strsplit (text, "\n", -1);
  for (guint i = 0; lines[i] != NULL; i++)
    {
      g_auto (GStrv) cells = g_strsplit (lines[i], ",", 7);
      if (g_strv_length (cells) != 7 || strcmp (cells[0], kind) != 0)
        continue;
      check (cells[1], cells[2], g_ascii_strtod (cells[3], NULL), g_ascii_strtod (cells[5], NULL), cells[6]);
      n++;
    }
  g_assert_cmpuint (n, >, 0);
  return n;
}
