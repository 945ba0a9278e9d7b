/* Colours can be read, and media told apart without colour.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "draw/theme.h"
#include <math.h>

/* Relative luminance and contrast as WCAG 2.1 defines them. */
static double
luminance (const HlColour *c)
{
  const double parts[3] = { c->r, c->g, c->b }, weights[3] = { 0.2126, 0.7152, 0.0722 };
  double sum = 0.0;
  for (int i = 0; i < 3; i++)
    sum += weights[i] * (parts[i] <= 0.03928 ? parts[i] / 12.92 : pow ((parts[i] + 0.055) / 1.055, 2.4));
  return sum;
}

static double
contrast (const HlColour *a, const HlColour *b)
{
  double x = luminance (a) + 0.05, y = luminance (b) + 0.05;
  return x > y ? x / y : y / x;
}

/* WCAG 2.1 asks for 4.5 for text. */
static void
test_words_are_readable (void)
{
  for (int id = 0; id < HL_N_THEMES; id++)
    {
      const HlTheme *t = hl_theme (id);
      const HlColour *words[] = { &t->ink, &t->quiet, &t->accent, &t->given, &t->assumed, &t->tied, &t->found, &t->error };
      for (guint i = 0; i < G_N_ELEMENTS (words); i++)
        {
          g_assert_cmpfloat (contrast (words[i], &t->ground), >=, 4.5);
          g_assert_cmpfloat (contrast (words[i], &t->card), >=, 4.5);
        }
    }
}

/* Lines: 2.2 for the lightest, which are amber and sky blue and have their second cue; 3 as WCAG asks of graphics for the others. */
static void
test_lines_are_visible (void)
{
  for (int id = 0; id < HL_N_THEMES; id++)
    {
      const HlTheme *t = hl_theme (id);
      const HlColour *strong[] = { &t->steam, &t->water, &t->gas, &t->shaft };
      const HlColour *light[] = { &t->wet, &t->cooling };
      for (guint i = 0; i < G_N_ELEMENTS (strong); i++)
        g_assert_cmpfloat (contrast (strong[i], &t->ground), >=, 3.0);
      for (guint i = 0; i < G_N_ELEMENTS (light); i++)
        g_assert_cmpfloat (contrast (light[i], &t->ground), >=, 2.2);
    }
}

typedef struct { double width, dash[2]; int n_dashes; } Pen;

static Pen
pen_of (HlLook look)
{
  cairo_surface_t *surface = cairo_image_surface_create (CAIRO_FORMAT_A8, 4, 4);
  cairo_t *cr = cairo_create (surface);
  Pen pen = { 0 };
  hl_set_look_pen (cr, hl_theme (HL_THEME_LIGHT), look, FALSE);
  pen.width = cairo_get_line_width (cr);
  pen.n_dashes = cairo_get_dash_count (cr);
  if (pen.n_dashes == 2)
    cairo_get_dash (cr, pen.dash, NULL);
  cairo_destroy (cr);
  cairo_surface_destroy (surface);
  return pen;
}

static void
test_each_medium_has_a_second_cue (void)
{
  for (int a = 0; a < HL_N_LOOKS; a++)
    for (int b = a + 1; b < HL_N_LOOKS; b++)
      {
        Pen p = pen_of (a), q = pen_of (b);
        gboolean is_other_width = fabs (p.width - q.width) >= 0.35;
        gboolean is_other_dash = p.n_dashes != q.n_dashes || fabs (p.dash[0] - q.dash[0]) > 2.0;
        g_test_message ("%s and %s", hl_look_name (a), hl_look_name (b));
        g_assert_true (is_other_width || is_other_dash || a == HL_LOOK_UNKNOWN || b == HL_LOOK_UNKNOWN);
      }
}

static HlLook
look_of (double p, double x)
{
  HlStreamResult result = { .has_state = TRUE };
  g_assert_cmpint (hl_fluid_state_px (hl_fluid_water (), p, x, &result.state), ==, HL_OK);
  return hl_stream_look (&result);
}

static void
test_look_follows_the_state (void)
{
  HlStreamResult result = { .has_state = TRUE };
  g_assert_cmpint (hl_stream_look (NULL), ==, HL_LOOK_UNKNOWN);
  g_assert_cmpint (hl_fluid_state_pT (hl_fluid_water (), 65e5, 758.15, &result.state), ==, HL_OK);
  g_assert_cmpint (hl_stream_look (&result), ==, HL_LOOK_STEAM);
  g_assert_cmpint (hl_fluid_state_pT (hl_fluid_water (), 65e5, 350.0, &result.state), ==, HL_OK);
  g_assert_cmpint (hl_stream_look (&result), ==, HL_LOOK_WATER);
  g_assert_cmpint (look_of (7000.0, 0.9), ==, HL_LOOK_WET);
  g_assert_cmpint (look_of (7000.0, 0.0), ==, HL_LOOK_WATER);
  g_assert_cmpint (look_of (7000.0, 1.0), ==, HL_LOOK_STEAM);
  result.has_state = FALSE;
  g_assert_cmpint (hl_stream_look (&result), ==, HL_LOOK_UNKNOWN);

  /* Flue gas is gas above and below its dew point, whatever condenses of it. */
  HlStreamResult flue = { .has_state = TRUE, .fluid = hl_fluid_lookup ("flue-gas") };
  g_assert_cmpint (hl_fluid_state_pT (flue.fluid, 1e5, 400.0, &flue.state), ==, HL_OK);
  g_assert_cmpint (hl_stream_look (&flue), ==, HL_LOOK_GAS);
  g_assert_cmpint (hl_fluid_state_pT (flue.fluid, 1e5, 310.0, &flue.state), ==, HL_OK);
  g_assert_cmpint (flue.state.phase, ==, HL_PHASE_TWO_PHASE);
  g_assert_cmpint (hl_stream_look (&flue), ==, HL_LOOK_GAS);
}

static void
test_stale_lines_are_grey (void)
{
  const HlTheme *theme = hl_theme (HL_THEME_LIGHT);
  for (int look = 0; look < HL_N_LOOKS; look++)
    g_assert_true (hl_look_colour (theme, look, TRUE) == &theme->stale);
  g_assert_true (hl_look_colour (theme, HL_LOOK_STEAM, FALSE) == &theme->steam);
}

int
main (int argc, char **argv)
{
  g_test_init (&argc, &argv, NULL);
  g_test_add_func ("/draw/theme/words-are-readable", test_words_are_readable);
  g_test_add_func ("/draw/theme/lines-are-visible", test_lines_are_visible);
  g_test_add_func ("/draw/theme/each-medium-has-a-second-cue", test_each_medium_has_a_second_cue);
  g_test_add_func ("/draw/theme/look-follows-the-state", test_look_follows_the_state);
  g_test_add_func ("/draw/theme/stale-lines-are-grey", test_stale_lines_are_grey);
  return g_test_run ();
}
