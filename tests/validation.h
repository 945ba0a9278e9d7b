/* Checks against published values: each is asserted, and told to whoever writes the page of validation.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#pragma once
#include <glib.h>
#include <math.h>
#include <stdio.h>

/* @ours must lie within @tolerance of @published, in the same unit.  @source: where it was published, and "from memory" where
 * the value was not read there; @subject: the example or the state; @digits: of both numbers on the page.
 * With HEATLOOM_VALIDATION=FILE in the environment the row is added to that file, fields parted by tabs. */
static inline void
validate (const char *section, const char *subject, const char *source, const char *quantity, const char *unit,
          double published, double ours, double tolerance, int digits)
{
  const char *path = g_getenv ("HEATLOOM_VALIDATION");
  FILE *file = path != NULL ? fopen (path, "a") : NULL;
  if (file != NULL)
    {
      fprintf (file, "%s\t%s\t%s\t%s\t%s\t%.*g\t%.*g\t%.17g\n", section, subject, source, quantity, unit, digits, published, digits, ours, tolerance);
      fclose (file);
    }
  if (!(fabs (ours - published) <= tolerance))
    g_error ("%s, %s of %s: %.*g %s, published %.*g, allowed %.3g", source, quantity, subject, digits + 2, ours, unit, digits + 2, published, tolerance);
}
