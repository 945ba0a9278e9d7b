/* Texts that keep to their place on paper: cut with dots, or wrapped.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "draw/sheet-private.h"
#include "draw/text.h"

#define LEAST_SHARE 0.78      /* of its size that a text shrinks to before it is cut */

void
hl_text_show_within (cairo_t *cr, const HlTheme *theme, const char *text, double x, double y, double width, int align, double size, gboolean is_bold)
{
  PangoLayout *layout = hl_text_layout (cr, theme, text, size, is_bold);
  PangoRectangle extents;
  double shown;
  pango_layout_get_extents (layout, NULL, &extents);
  shown = (double) extents.width / PANGO_SCALE;
  if (shown > width)
    {
      g_object_unref (layout);
      layout = hl_text_layout (cr, theme, text, size * MAX (0.99 * width / shown, LEAST_SHARE), is_bold);
    }
  pango_layout_set_ellipsize (layout, PANGO_ELLIPSIZE_END);
  pango_layout_set_width (layout, (int) (MAX (width, size) * PANGO_SCALE));
  /* Where a title runs from the right it is still put where the form wants it. */
  pango_layout_set_auto_dir (layout, FALSE);
  pango_layout_get_extents (layout, NULL, &extents);
  shown = (double) extents.width / PANGO_SCALE;
  cairo_move_to (cr, x - (align < 0 ? 0.0 : align > 0 ? shown : shown / 2.0) - (double) extents.x / PANGO_SCALE,
                 y - (double) pango_layout_get_baseline (layout) / PANGO_SCALE);
  pango_cairo_show_layout (cr, layout);
  g_object_unref (layout);
}

double
hl_text_show_wrapped (cairo_t *cr, const HlTheme *theme, const char *text, double x, double y, double width, double size, gboolean is_bold)
{
  PangoLayout *layout = hl_text_layout (cr, theme, text, size, is_bold);
  PangoRectangle extents;
  pango_layout_set_single_paragraph_mode (layout, FALSE);
  pango_layout_set_width (layout, (int) (MAX (width, size) * PANGO_SCALE));
  pango_layout_set_wrap (layout, PANGO_WRAP_WORD_CHAR);
  pango_layout_get_extents (layout, NULL, &extents);
  cairo_move_to (cr, x, y);
  pango_cairo_show_layout (cr, layout);
  g_object_unref (layout);
  return (double) extents.height / PANGO_SCALE;
}
