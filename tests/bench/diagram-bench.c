/* How long a state diagram takes to build and to draw at 960 x 600 pixels.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "../draw/cycle-fixtures.h"
#include <time.h>

#define WIDTH   960
#define HEIGHT  600
#define REPEATS 60

/* Time of this thread on the processor [us]: other work on the machine does not count. */
static double
now (void)
{
  struct timespec time;
  clock_gettime (CLOCK_THREAD_CPUTIME_ID, &time);
  return time.tv_sec * 1e6 + time.tv_nsec / 1e3;
}

static int
compare_doubles (gconstpointer a, gconstpointer b)
{
  double x = *(const double *) a, y = *(const double *) b;
  return (x > y) - (x < y);
}

static double
median (double times[REPEATS])
{
  qsort (times, REPEATS, sizeof (double), compare_doubles);
  return times[REPEATS / 2] / 1e3;
}

static void
measure (const char *name, const HlCycle *cycle)
{
  double build[REPEATS], draw[REPEATS];
  cairo_surface_t *surface = cairo_image_surface_create (CAIRO_FORMAT_RGB24, WIDTH, HEIGHT);
  for (int i = 0; i < REPEATS; i++)
    {
      double start = now (), built;
      HlStateDiagram *diagram = hl_state_diagram_from_cycle (cycle, WIDTH, HEIGHT);
      cairo_t *cr = cairo_create (surface);
      built = now ();
      hl_state_diagram_draw (diagram, cr, hl_theme (HL_THEME_LIGHT), FALSE, -1);
      cairo_destroy (cr);
      build[i] = built - start;
      draw[i] = now () - built;
      hl_state_diagram_free (diagram);
    }
  /* Before the medians, which sort the times. */
  g_print ("%-28s %3u states: first build %6.2f ms, draw %6.2f ms;", name, cycle->points->len, build[0] / 1e3, draw[0] / 1e3);
  g_print ("  then build %5.2f ms, draw %5.2f ms (median of %d)\n", median (build), median (draw), REPEATS);
  cairo_surface_destroy (surface);
}

int
main (void)
{
  g_autoptr (HlCycle) empty = hl_cycle_new (NULL, HL_UNITS_METRIC), simple = cycle_simple (HL_UNITS_METRIC);
  g_autoptr (HlCycle) industry = cycle_industry (HL_UNITS_METRIC), reheat = cycle_reheat (HL_UNITS_METRIC, 168e5, 811.15);
  g_autoptr (HlCycle) crowd = cycle_random (5, 200);
  double start = now ();
  guint n = hl_dome_of (hl_fluid_water ())->n;
  g_print ("state diagram, %d x %d pixels\n", WIDTH, HEIGHT);
  g_print ("saturation line, %u points, once a program: %.2f ms\n", n, (now () - start) / 1e3);
  measure ("empty (first: loads fonts)", empty);
  measure ("simple loop", simple);
  measure ("industry, three extractions", industry);
  measure ("reheat, seven heaters", reheat);
  measure ("200 random states", crowd);
  return 0;
}
