/* The heat diagram: heat balances on both sides, ends are the streams' own, the pinch is the least difference, texts stand clear.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "../engine/plants.h"
#include "draw/heat-diagram-private.h"
#include <math.h>
#include <string.h>

static const struct { double width, height; } sizes[] = { { 400, 300 }, { 700, 300 }, { 960, 600 }, { 1280, 420 }, { 1600, 1000 } };

static const HlHeatPoint *
point (const GArray *side, guint n)
{
  return &g_array_index (side, HlHeatPoint, n);
}

static const HlHeatPoint *
last (const GArray *side)
{
  return point (side, side->len - 1);
}

static HlHeatCurve *
curve_of (const HlSolution *solution, const char *id)
{
  HlHeatCurve *curve = hl_heat_curve_new (solution, hl_plant_component_index (hl_solution_plant (solution), id));
  g_assert_nonnull (curve);
  return curve;
}

/* What holds for every curve: heat rises, both sides end at the duty, nothing lies closer than the pinch. */
static void
check_curve (const HlHeatCurve *curve)
{
  const GArray *sides[] = { curve->hot, curve->cold };
  for (guint k = 0; k < 2; k++)
    {
      if (sides[k]->len == 0)
        continue;
      g_assert_cmpfloat (point (sides[k], 0)->heat, ==, 0.0);
      test_assert_near (last (sides[k])->heat, curve->duty, 1e-7);
      for (guint i = 1; i < sides[k]->len; i++)
        g_assert_cmpfloat (point (sides[k], i)->heat, >=, point (sides[k], i - 1)->heat);
    }
  g_assert_true (curve->has_pinch == (curve->hot->len > 0 && curve->cold->len > 0));
  for (int i = 1; curve->has_pinch && i < 1000; i++)
    g_assert_cmpfloat (hl_heat_curve_difference (curve, curve->duty * i / 1000.0), >=, curve->pinch - 1e-5);
}

static void
test_condenser (void)
{
  g_autoptr (HlPlant) plant = test_plant (test_simple_loop);
  g_autoptr (HlSolution) solution = hl_solve (plant, NULL);
  g_autoptr (HlHeatCurve) curve = curve_of (solution, "C1");
  test_assert_solved (solution);
  check_curve (curve);
  test_assert_near (curve->duty, test_value (solution, "C1.heat"), 1e-9);
  if (curve->cold->len > 0)
    {
      test_assert_near (curve->pinch, test_value (solution, "C1.terminal_difference"), 1e-4);
      test_assert_near (curve->pinch_heat, curve->duty, 1e-6);
    }
  /* Wet steam condenses at one temperature. */
  g_assert_cmpfloat_with_epsilon (point (curve->hot, 0)->T, last (curve->hot)->T, 1e-6);
}

/* A closed heater with a drain that enters: duty and ends are the solved ones. */
static void
check_heater (const HlSolution *solution, const char *id)
{
  g_autoptr (HlHeatCurve) curve = curve_of (solution, id);
  g_autofree char *heat = g_strconcat (id, ".heat", NULL), *feed_in = g_strconcat (id, ".feed_inlet.T", NULL);
  g_autofree char *feed_out = g_strconcat (id, ".feed_outlet.T", NULL), *steam = g_strconcat (id, ".steam.T", NULL), *drain = g_strconcat (id, ".drain.T", NULL);
  check_curve (curve);
  test_assert_near (curve->duty, test_value (solution, heat), 1e-7);
  test_assert_near (point (curve->cold, 0)->T, test_value (solution, feed_in), 1e-9);
  test_assert_near (last (curve->cold)->T, test_value (solution, feed_out), 1e-9);
  test_assert_near (last (curve->hot)->T, test_value (solution, steam), 1e-6);
  test_assert_near (point (curve->hot, 0)->T, test_value (solution, drain), 1e-6);
  g_assert_cmpuint (curve->borders->len, >=, 1);
}

static void
test_closed_heaters (void)
{
  g_autoptr (HlPlant) plant = test_plant (test_large_plant);
  g_autoptr (HlSolution) solution = hl_solve (plant, NULL);
  guint n = 0;
  test_assert_solved (solution);
  for (guint i = 0; i < hl_plant_n_components (plant); i++)
    {
      const HlComponent *component = hl_plant_component (plant, i);
      if (strcmp (component->kind->id, "closed_heater") != 0)
        continue;
      check_heater (solution, component->id);
      n++;
    }
  g_assert_cmpuint (n, >=, 4);
}

/* Of a boiler only the water's side is known; its reheat adds up with the main flow. */
static void
test_boiler_shows_one_side (void)
{
  g_autoptr (HlPlant) plant = test_plant (test_reheat_plant);
  g_autoptr (HlSolution) solution = hl_solve (plant, NULL);
  g_autoptr (HlHeatCurve) curve = NULL;
  for (guint i = 0; i < hl_plant_n_components (plant); i++)
    if (strcmp (hl_plant_component (plant, i)->kind->id, "boiler") == 0 || strcmp (hl_plant_component (plant, i)->kind->id, "heat_input") == 0)
      {
        g_autofree char *heat = g_strconcat (hl_plant_component (plant, i)->id, ".heat", NULL);
        curve = hl_heat_curve_new (solution, (int) i);
        g_assert_nonnull (curve);
        test_assert_near (curve->duty, test_value (solution, heat), 1e-9);
      }
  g_assert_nonnull (curve);
  check_curve (curve);
  g_assert_cmpuint (curve->hot->len, ==, 0);
  g_assert_true (isnan (hl_heat_curve_difference (curve, curve->duty / 2.0)));
  /* Added up by temperature, so it never falls. */
  for (guint i = 1; i < curve->cold->len; i++)
    g_assert_cmpfloat (point (curve->cold, i)->T, >=, point (curve->cold, i - 1)->T);
}

/* The composite curves hold the heat of every exchanger with two sides, and cannot come closer than the closest of them. */
static void
test_composite_curves (void)
{
  g_autoptr (HlPlant) plant = test_plant (test_large_plant);
  g_autoptr (HlSolution) solution = hl_solve (plant, NULL);
  g_autoptr (HlHeatCurve) all = hl_heat_curve_new (solution, HL_HEAT_ALL);
  g_autoptr (GArray) exchangers = hl_heat_exchangers (solution);
  double duty = 0.0, least = G_MAXDOUBLE;
  g_assert_nonnull (all);
  check_curve (all);
  for (guint i = 0; i < exchangers->len; i++)
    {
      g_autoptr (HlHeatCurve) curve = hl_heat_curve_new (solution, (int) g_array_index (exchangers, guint, i));
      if (!curve->has_pinch)
        continue;
      duty += curve->duty;
      least = MIN (least, curve->pinch);
    }
  test_assert_near (all->duty, duty, 1e-9);
  g_assert_cmpfloat (all->pinch, >=, least - 1e-5);
  for (guint i = 1; i < all->hot->len; i++)
    g_assert_cmpfloat (point (all->hot, i)->T, >=, point (all->hot, i - 1)->T);
}

static void
assert_texts_are_apart (const HlHeatDiagram *diagram)
{
  for (guint i = 0; i < diagram->texts->len; i++)
    {
      const HlBox *box = &g_array_index (diagram->texts, HlHeatText, i).box;
      g_assert_true (box->x >= diagram->frame.x && box->x + box->width <= diagram->frame.x + diagram->frame.width);
      g_assert_true (box->y >= diagram->frame.y && box->y + box->height <= diagram->frame.y + diagram->frame.height);
      for (guint k = i + 1; k < diagram->texts->len; k++)
        g_assert_false (hl_box_overlaps (box, &g_array_index (diagram->texts, HlHeatText, k).box));
    }
}

static void
assert_nothing_is_clipped (const HlHeatDiagram *diagram, HlThemeId theme)
{
  cairo_surface_t *surface = cairo_recording_surface_create (CAIRO_CONTENT_COLOR_ALPHA, NULL);
  cairo_t *cr = cairo_create (surface);
  double x, y, width, height;
  hl_heat_diagram_draw (diagram, cr, hl_theme (theme), FALSE);
  g_assert_cmpint (cairo_status (cr), ==, CAIRO_STATUS_SUCCESS);
  cairo_recording_surface_ink_extents (surface, &x, &y, &width, &height);
  g_assert_cmpfloat (x, >=, 0.0);
  g_assert_cmpfloat (y, >=, 0.0);
  g_assert_cmpfloat (x + width, <=, diagram->width);
  g_assert_cmpfloat (y + height, <=, diagram->height);
  cairo_destroy (cr);
  cairo_surface_destroy (surface);
}

static gboolean
has_kind (const HlHeatDiagram *diagram, HlHeatTextKind kind)
{
  for (guint i = 0; i < diagram->texts->len; i++)
    if (g_array_index (diagram->texts, HlHeatText, i).kind == kind)
      return TRUE;
  return FALSE;
}

static void
test_pictures_are_clean (void)
{
  const char *const plants[] = { test_simple_loop, test_reheat_plant, test_large_plant };
  for (guint n = 0; n < G_N_ELEMENTS (plants); n++)
    {
      g_autoptr (HlPlant) plant = test_plant (plants[n]);
      g_autoptr (HlSolution) solution = hl_solve (plant, NULL);
      for (int component = HL_HEAT_ALL; component < (int) hl_plant_n_components (plant); component++)
        for (guint i = 0; i < G_N_ELEMENTS (sizes); i++)
          {
            g_autoptr (HlHeatDiagram) diagram = hl_heat_diagram_new (solution, component, (HlUnitSet) (i % HL_N_UNIT_SETS), sizes[i].width, sizes[i].height);
            assert_nothing_is_clipped (diagram, HL_THEME_DARK);
            assert_nothing_is_clipped (diagram, HL_THEME_PAPER);
            if (diagram->curve == NULL)
              continue;
            assert_texts_are_apart (diagram);
            g_assert_cmpuint (hl_plot_layer_n (diagram->curves), >=, 1);
            /* The pinch is named in every size. */
            g_assert_true (has_kind (diagram, HL_HEAT_TEXT_PINCH) == diagram->curve->has_pinch);
          }
    }
}

static void
test_nothing_known_says_so (void)
{
  g_autoptr (HlPlant) plant = hl_plant_new ();
  g_autoptr (HlSolution) solution = hl_solve (plant, NULL);
  g_autoptr (HlHeatDiagram) diagram = hl_heat_diagram_new (solution, HL_HEAT_ALL, HL_UNITS_METRIC, 400.0, 300.0);
  g_assert_null (diagram->curve);
  assert_nothing_is_clipped (diagram, HL_THEME_LIGHT);
}

/* Zones cover the duty; with the component's own conductance, of fewer parts, theirs agrees to what the parts leave open: none
 * where the condensing side is level, a few per mille where desuperheating bends. */
static void
test_zones_add_up (void)
{
  static const struct { const char *id; double tolerance; } rows[] = { { "H1", 2e-2 } };
  g_autoptr (HlPlant) plant = test_plant (test_reheat_plant);
  g_autoptr (HlSolution) solution = hl_solve (plant, NULL);
  test_assert_solved (solution);
  for (guint k = 0; k < G_N_ELEMENTS (rows); k++)
    {
      g_autoptr (HlHeatCurve) curve = hl_heat_curve_new (solution, hl_plant_component_index (plant, rows[k].id));
      g_autofree char *ua = g_strdup_printf ("%s.UA", rows[k].id);
      double heat = 0.0, conductance = 0.0;
      g_assert_cmpuint (curve->zones->len, ==, curve->borders->len + 1);
      for (guint i = 0; i < curve->zones->len; i++)
        {
          const HlHeatZone *zone = &g_array_index (curve->zones, HlHeatZone, i);
          heat += zone->heat;
          conductance += zone->conductance;
          g_assert_cmpfloat (zone->hot_in, >=, zone->hot_out - 1e-6);
          g_assert_cmpfloat (zone->cold_out, >=, zone->cold_in - 1e-6);
          test_assert_near (zone->mean_difference * zone->conductance, zone->heat, 1e-12);
        }
      test_assert_near (heat, curve->duty, 1e-12);
      test_assert_near (conductance, test_value (solution, ua), rows[k].tolerance);
    }
}

int
main (int argc, char **argv)
{
  g_test_init (&argc, &argv, NULL);
  g_test_add_func ("/draw/heat-diagram/condenser", test_condenser);
  g_test_add_func ("/draw/heat-diagram/closed-heaters", test_closed_heaters);
  g_test_add_func ("/draw/heat-diagram/boiler-shows-one-side", test_boiler_shows_one_side);
  g_test_add_func ("/draw/heat-diagram/composite-curves", test_composite_curves);
  g_test_add_func ("/draw/heat-diagram/pictures-are-clean", test_pictures_are_clean);
  g_test_add_func ("/draw/heat-diagram/nothing-known-says-so", test_nothing_known_says_so);
  g_test_add_func ("/draw/heat-diagram/zones-add-up", test_zones_add_up);
  return g_test_run ();
}
