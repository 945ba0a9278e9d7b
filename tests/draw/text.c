/* Widths without shaping come close to what is drawn.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "draw/text.h"
#include <math.h>

static void
test_width_is_close_to_what_is_drawn (void)
{
  static const char *const texts[] = { "16.67 kg/s", "65.00 bar · 485.0 °C", "T1 high pressure", "14.89 MW · η 0.830", "Wärmezufuhr", "" };
  cairo_surface_t *surface = cairo_image_surface_create (CAIRO_FORMAT_A8, 8, 8);
  cairo_t *cr = cairo_create (surface);
  for (int id = 0; id < HL_N_THEMES; id++)
    for (guint i = 0; i < G_N_ELEMENTS (texts); i++)
      for (int bold = 0; bold < 2; bold++)
        {
          const HlTheme *theme = hl_theme (id);
          double measured = hl_text_width (theme, texts[i], 10.5, bold);
          double drawn = hl_text_show (cr, theme, texts[i], 0.0, 0.0, -1, 10.5, bold);
          g_assert_cmpfloat (fabs (measured - drawn), <=, 0.03 * drawn + 0.01);   /* kerning is what is left out */
        }
  cairo_destroy (cr);
  cairo_surface_destroy (surface);
}

static void
test_width_grows_with_size (void)
{
  const HlTheme *theme = hl_theme (HL_THEME_PAPER);
  double small = hl_text_width (theme, "65 bar", 10.0, FALSE), large = hl_text_width (theme, "65 bar", 20.0, FALSE);
  g_assert_cmpfloat (small, >, 20.0);
  g_assert_cmpfloat_with_epsilon (large, 2.0 * small, 1e-9);
}

/* Numbers that change must not make a label dance. */
static void
test_figures_have_one_width (void)
{
  for (int id = 0; id < HL_N_THEMES; id++)
    g_assert_cmpfloat_with_epsilon (hl_text_width (hl_theme (id), "1111", 10.0, TRUE), hl_text_width (hl_theme (id), "8888", 10.0, TRUE), 0.02);
}

int
main (int argc, char **argv)
{
  g_test_init (&argc, &argv, NULL);
  g_test_add_func ("/draw/text/width-is-close-to-what-is-drawn", test_width_is_close_to_what_is_drawn);
  g_test_add_func ("/draw/text/width-grows-with-size", test_width_grows_with_size);
  g_test_add_func ("/draw/text/figures-have-one-width", test_figures_have_one_width);
  return g_test_run ();
}
