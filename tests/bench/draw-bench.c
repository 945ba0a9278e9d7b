/* Times layouts and pictures of plants, from a simple loop to two hundred components.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "draw/sheet.h"
#include <math.h>
#include <stdio.h>
#include "demo-plants.h"
#include "solution-fixture.h"

#define N_REPEATS 15

typedef struct {
  HlPlant    *plant, *moved;
  HlSolution *solution;
  HlLayout   *layout;
} Subject;

typedef void (*Work) (const Subject *subject);

static void
lay_out_afresh (const Subject *s)
{
  hl_layout_unref (hl_layout_new (s->plant, s->solution, hl_theme (HL_THEME_LIGHT)));
}

static void
lay_out_after_a_move (const Subject *s)
{
  hl_layout_unref (hl_layout_next (s->layout, s->moved, s->solution, hl_theme (HL_THEME_LIGHT)));
}

static void
draw_picture (const Subject *s)
{
  cairo_surface_t *surface = cairo_image_surface_create (CAIRO_FORMAT_RGB24, 1600, 1000);
  cairo_t *cr = cairo_create (surface);
  HlBox extents;
  double scale;
  hl_layout_extents (s->layout, &extents);
  scale = fmin (1600.0 / extents.width, 1000.0 / extents.height);
  cairo_scale (cr, scale, scale);
  cairo_translate (cr, -extents.x, -extents.y);
  hl_draw_canvas (cr, hl_theme (HL_THEME_LIGHT), s->layout, s->plant, s->solution);
  cairo_destroy (cr);
  cairo_surface_destroy (surface);
}

/* Best of some runs [ms]: the rest is other programs' time. */
static double
time_work (Work work, const Subject *subject)
{
  double best = INFINITY;
  work (subject);
  for (int i = 0; i < N_REPEATS; i++)
    {
      gint64 start = g_get_monotonic_time ();
      work (subject);
      best = fmin (best, (g_get_monotonic_time () - start) / 1e3);
    }
  return best;
}

/* Moves the component in the middle by two units. */
static HlPlant *
move_one (const HlPlant *plant)
{
  HlComponent *component = hl_component_copy (hl_plant_component (plant, hl_plant_n_components (plant) / 2));
  component->x += 2;
  component->y += 1;
  return hl_plant_with_component (plant, component);
}

static void
run (const char *name, HlPlant *plant)
{
  Subject s = { .plant = plant, .moved = move_one (plant), .solution = hl_fixture_solution (plant, TRUE) };
  s.layout = hl_layout_new (plant, s.solution, hl_theme (HL_THEME_LIGHT));
  printf ("%-26s %4u components %4u streams   layout %7.2f ms   after a move %7.2f ms   picture %7.2f ms\n", name,
          hl_plant_n_components (plant), hl_plant_n_streams (plant), time_work (lay_out_afresh, &s),
          time_work (lay_out_after_a_move, &s), time_work (draw_picture, &s));
  hl_layout_unref (s.layout);
  hl_solution_unref (s.solution);
  hl_plant_unref (s.moved);
  hl_plant_unref (plant);
}

int
main (void)
{
  run ("simple loop", hl_demo_simple_loop ());
  run ("extraction", hl_demo_extraction ());
  run ("reheat, two heaters", hl_demo_reheat ());
  run ("row of eight heaters", hl_demo_heater_row (8));
  run ("five extraction plants", hl_demo_repeated (5));
  run ("eighteen of them", hl_demo_repeated (18));
  run ("random, dense", hl_demo_random (3, 60));
  run ("random, 200 components", hl_demo_random (5, 200));
  return 0;
}
