/* What the tests of media share: every medium by coefficients, comparing numbers with what went wrong in words.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#pragma once
#include "fluid/fluid.h"

#include <math.h>
#include <string.h>

#define MAX_MEDIA 64

/* All media with a dome but water by IF97; the list is g_strfreev()ed by the caller. */
static inline char **
all_media (void)
{
  char **ids = hl_fluid_list ();
  guint n = 0;
  g_assert_cmpstr (ids[0], ==, "water");
  g_free (ids[0]);
  for (guint i = 1; ids[i] != NULL; i++)
    if (hl_fluid_has_dome (hl_fluid_lookup (ids[i])))
      ids[n++] = ids[i];
    else
      g_free (ids[i]);
  ids[n] = NULL;
  return ids;
}

/* |value - expected| <= relative * max(|expected|, floor) */
#define assert_near(fluid, what, at_p, at_T, value, expected, relative, floor) \
  assert_near_at (G_STRLOC, (fluid), (what), (at_p), (at_T), (value), (expected), (relative), (floor))
static inline void
assert_near_at (const char *where, const HlFluid *fluid, const char *what, double p, double T, double value, double expected, double relative,
                double floor)
{
  if (!(fabs (value - expected) <= relative * fmax (fabs (expected), floor)))
    g_error ("%s: %s, %s at p = %.10g Pa, T = %.10g K: got %.15g, expected %.15g, off by %.2g", where, hl_fluid_id (fluid), what, p, T, value, expected,
             fabs (value - expected) / fmax (fabs (expected), floor));
}
