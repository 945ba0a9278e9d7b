/* Draws the finished bands.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "draw/bands-private.h"
#include "draw/text.h"
#include "plant/i18n.h"

#define LINE 1.25

static const HlColour *
colour_of (HlBandKind kind, const HlTheme *theme, gboolean is_stale)
{
  if (is_stale)
    return &theme->stale;
  switch (kind)
    {
    case HL_BAND_DELIVERED:
      return &theme->wet;
    case HL_BAND_REJECTED:
      return &theme->cooling;
    case HL_BAND_WATER_IN:
    case HL_BAND_WATER_OUT:
    case HL_BAND_PUMPS:
      return &theme->water;
    case HL_BAND_HEAT_LOSS:
    case HL_BAND_HEAT:
      return &theme->steam;
    case HL_BAND_POWER:
    case HL_BAND_SHAFT_LOSS:
    case HL_BAND_OWN:
    case HL_BAND_NET:
      return &theme->accent;
    default:
      return &theme->gas;
    }
}

static void
fill (cairo_t *cr, const HlColour *colour)
{
  cairo_set_source_rgba (cr, colour->r, colour->g, colour->b, 0.82 * colour->a);
  cairo_fill (cr);
}

/* A stretch of the main band, with its steps. */
static void
draw_stretch (const HlBandsPicture *picture, cairo_t *cr, const HlColour *colour, double from, double to)
{
  double x = from;
  while (x < to - 1e-9)
    {
      double next = to, top, bottom;
      if (picture->has_loop && picture->loop_to > x + 1e-9)
        next = MIN (next, picture->loop_to);
      if (picture->has_loop && picture->loop_from > x + 1e-9)
        next = MIN (next, picture->loop_from);
      for (guint i = 0; i < picture->strips->len; i++)
        {
          const HlStrip *strip = &g_array_index (picture->strips, HlStrip, i);
          if ((strip->way == HL_STRIP_DOWN || strip->way == HL_STRIP_UP) && strip->x > x + 1e-9)
            next = MIN (next, strip->x);
        }
      hl_bands_picture_edges (picture, x, &top, &bottom);
      cairo_rectangle (cr, x, top, next - x, MAX (bottom - top, 0.0));
      x = next;
    }
  fill (cr, colour);
}

static void
draw_main (const HlBandsPicture *picture, cairo_t *cr, const HlTheme *theme, gboolean is_stale)
{
  double top, bottom, reach;
  draw_stretch (picture, cr, is_stale ? &theme->stale : &theme->gas, picture->left, picture->steam_from);
  draw_stretch (picture, cr, is_stale ? &theme->stale : &theme->steam, picture->steam_from, picture->power_from);
  draw_stretch (picture, cr, is_stale ? &theme->stale : &theme->accent, picture->power_from, picture->right);
  hl_bands_picture_edges (picture, picture->right, &top, &bottom);
  if (bottom - top < 0.5)
    return;
  reach = MIN (1.3 * picture->text_size, (bottom - top) / 2.0 + 4.0);
  cairo_move_to (cr, picture->right, top - 3.0);
  cairo_line_to (cr, picture->right + reach, (top + bottom) / 2.0);
  cairo_line_to (cr, picture->right, bottom + 3.0);
  fill (cr, is_stale ? &theme->stale : &theme->accent);
}

/* A quarter turn, a straight piece and a head; drawn downwards, mirrored for what goes up. */
static void
draw_strip (const HlBandsPicture *picture, const HlStrip *strip, cairo_t *cr, const HlTheme *theme, gboolean is_stale)
{
  double r = picture->radius, w = MAX (strip->width, 0.7), length = strip->way == HL_STRIP_DOWN ? strip->tip - strip->edge : strip->edge - strip->tip;
  double head = MIN (MAX (w / 2.0 + 3.0, 5.0), MIN (1.6 * picture->text_size, MAX (length - r, 2.0))), neck = MAX (length - head, r);
  cairo_save (cr);
  cairo_translate (cr, strip->x, strip->edge);
  if (strip->way == HL_STRIP_UP)
    cairo_scale (cr, 1.0, -1.0);
  /* Bottom edge of the band at y 0, the strip's upper edge at -w. */
  cairo_move_to (cr, 0.0, -w);
  cairo_arc (cr, 0.0, r, r + w, -G_PI / 2.0, 0.0);
  cairo_line_to (cr, r + w, neck);
  cairo_line_to (cr, r + w + 3.0, neck);
  cairo_line_to (cr, r + w / 2.0, length);
  cairo_line_to (cr, r - 3.0, neck);
  cairo_line_to (cr, r, neck);
  cairo_arc_negative (cr, 0.0, r, r, 0.0, -G_PI / 2.0);
  cairo_close_path (cr);
  fill (cr, colour_of (strip->kind, theme, is_stale));
  cairo_restore (cr);
}

static void
draw_loop (const HlBandsPicture *picture, cairo_t *cr, const HlTheme *theme, gboolean is_stale)
{
  const HlColour *colour = colour_of (HL_BAND_PUMPS, theme, is_stale);
  double w = picture->loop_width, r = picture->radius + w / 2.0, y = picture->loop_level, start = picture->loop_edge + w / 2.0;
  double x = picture->loop_from + r, end = picture->loop_to;
  cairo_save (cr);
  cairo_new_path (cr);
  cairo_move_to (cr, picture->loop_from, start);
  cairo_arc_negative (cr, picture->loop_from, start - r, r, G_PI / 2.0, 0.0);
  cairo_line_to (cr, x, y + r);
  cairo_arc_negative (cr, x - r, y + r, r, 0.0, -G_PI / 2.0);
  cairo_line_to (cr, end - w / 2.0, y);
  cairo_arc_negative (cr, end - w / 2.0, y + r, r, -G_PI / 2.0, -G_PI);
  cairo_line_to (cr, end - w / 2.0 - r, picture->top);
  cairo_set_line_width (cr, MAX (w, 0.8));
  cairo_set_line_cap (cr, CAIRO_LINE_CAP_BUTT);
  cairo_set_source_rgba (cr, colour->r, colour->g, colour->b, 0.82 * colour->a);
  cairo_stroke (cr);
  cairo_restore (cr);
}

static void
draw_label (const HlStrip *strip, cairo_t *cr, const HlTheme *theme, gboolean is_stale)
{
  double x = strip->align < 0 ? strip->label.x : strip->label.x + strip->label.width / 2.0;
  for (guint i = 0; i < G_N_ELEMENTS (strip->lines); i++)
    {
      if (strip->lines[i] == NULL)
        continue;
      hl_set_colour (cr, i == 1 && !is_stale ? &theme->ink : &theme->quiet);
      hl_text_show (cr, theme, strip->lines[i], x, strip->label.y + (i * LINE + 0.95) * strip->size, strip->align, strip->size, i == 1);
    }
}

static void
draw_line (const HlBandsPicture *picture, cairo_t *cr, const HlTheme *theme, const char *text, double y, double size, gboolean is_bold)
{
  double room = picture->width - picture->clear - 2.6 * picture->text_size, width = hl_text_width (theme, text, size, is_bold);
  if (width > room)
    size *= MAX (0.98 * room / width, 0.3);
  hl_text_show (cr, theme, text, 1.3 * picture->text_size, y, -1, size, is_bold);
}

static void
draw_empty (const HlBandsPicture *picture, cairo_t *cr, const HlTheme *theme)
{
  const char *text = picture->of == HL_BANDS_EXERGY ? _("Bands appear here as soon as the exergy of the whole plant is known.")
                                                    : _("Bands appear here as soon as the energy of the whole plant is known.");
  double size = picture->text_size, width = hl_text_width (theme, text, size, FALSE);
  if (width > 0.95 * picture->width)
    size *= 0.93 * picture->width / width;
  hl_set_colour (cr, &theme->quiet);
  hl_text_show (cr, theme, text, picture->width / 2.0, picture->height / 2.0, 0, size, FALSE);
}

void
hl_bands_picture_draw (const HlBandsPicture *picture, cairo_t *cr, const HlTheme *theme, gboolean is_stale)
{
  g_return_if_fail (picture != NULL && cr != NULL && theme != NULL);
  cairo_save (cr);
  cairo_rectangle (cr, 0.0, 0.0, picture->width, picture->height);
  hl_set_colour (cr, &theme->ground);
  cairo_fill (cr);
  if (!picture->bands->is_complete)
    {
      draw_empty (picture, cr, theme);
      cairo_restore (cr);
      return;
    }
  hl_set_colour (cr, &theme->ink);
  draw_line (picture, cr, theme, picture->title, 1.8 * picture->text_size, 1.25 * picture->text_size, TRUE);
  hl_set_colour (cr, &theme->quiet);
  draw_line (picture, cr, theme, picture->remark, 3.3 * picture->text_size, picture->text_size, FALSE);
  if (picture->has_loop)
    draw_loop (picture, cr, theme, is_stale);
  draw_main (picture, cr, theme, is_stale);
  for (guint i = 0; i < picture->strips->len; i++)
    {
      const HlStrip *strip = &g_array_index (picture->strips, HlStrip, i);
      if (strip->way == HL_STRIP_DOWN || strip->way == HL_STRIP_UP)
        draw_strip (picture, strip, cr, theme, is_stale);
      draw_label (strip, cr, theme, is_stale);
    }
  cairo_restore (cr);
}
