/* Times what is handed over: sheet, workbook and report of each demo plant; arguments are the plant files.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "draw/report.h"
#include "draw/xlsx.h"
#include <math.h>
#include <stdio.h>

#define N_REPEATS 7

typedef GBytes *(*Work) (const HlSolution *solution);

static GBytes *
sheet (const HlSolution *solution)
{
  return hl_export_sheet (solution, HL_PAPER_A3, NULL, 0.0, HL_FORMAT_PDF, NULL);
}

static GBytes *
workbook (const HlSolution *solution)
{
  return hl_export_workbook (solution, HL_UNITS_METRIC, NULL);
}

static GBytes *
report (const HlSolution *solution)
{
  return hl_export_report (solution, HL_PAPER_A3, NULL, NULL);
}

/* Best of some runs [ms]: the rest is other programs' time. */
static double
time_work (Work work, const HlSolution *solution)
{
  double best = INFINITY;
  for (int i = 0; i < N_REPEATS; i++)
    {
      gint64 start = g_get_monotonic_time ();
      g_autoptr (GBytes) bytes = work (solution);
      g_assert_nonnull (bytes);
      best = fmin (best, (g_get_monotonic_time () - start) / 1e3);
    }
  return best;
}

int
main (int argc, char **argv)
{
  for (int i = 1; i < argc; i++)
    {
      g_autoptr (GError) error = NULL;
      g_autoptr (HlPlant) plant = hl_plant_load (argv[i], &error);
      g_autoptr (HlSolution) solution = NULL;
      if (plant == NULL)
        return fprintf (stderr, "%s\n", error->message), 1;
      solution = hl_solve (plant, NULL);
      printf ("%-48.48s %3u components   sheet %6.1f ms   workbook %6.1f ms   report %6.1f ms\n", hl_plant_title (plant), hl_plant_n_components (plant),
              time_work (sheet, solution), time_work (workbook, solution), time_work (report, solution));
    }
  return 0;
}
